package vectors

import (
	"testing"

	"github.com/stretchr/testify/require"
)

// A case that could not fail, or whose number has no source, is refused.
func TestCheckRefusesIdleCases(t *testing.T) {
	good := func() []Group {
		return []Group{{
			Source: Source{Provenance: "from memory"},
			Tests: []Test{{
				ID: "1", Codes: []string{"ACI 318-19"},
				Expect: map[string]Expected{"a": {Value: 1, Tolerance: 0.1, Why: "half of the last printed digit"}},
			}},
		}}
	}
	require.NoError(t, check(good()))
	for name, edit := range map[string]func(g []Group) []Group{
		"no groups":     func(g []Group) []Group { return nil },
		"no provenance": func(g []Group) []Group { g[0].Source.Provenance = ""; return g },
		"id twice":      func(g []Group) []Group { g[0].Tests = append(g[0].Tests, g[0].Tests[0]); return g },
		"no codes":      func(g []Group) []Group { g[0].Tests[0].Codes = nil; return g },
		"no expectation": func(g []Group) []Group {
			g[0].Tests[0].Expect = nil
			return g
		},
		"no tolerance": func(g []Group) []Group {
			g[0].Tests[0].Expect["a"] = Expected{Value: 1, Why: "x"}
			return g
		},
		"no reason": func(g []Group) []Group {
			g[0].Tests[0].Expect["a"] = Expected{Value: 1, Tolerance: 1}
			return g
		},
	} {
		require.Error(t, check(edit(good())), name)
	}
}
