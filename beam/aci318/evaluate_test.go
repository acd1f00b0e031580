package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/internal/expression"
)

// requireEvaluable computes every step of a check again from its expression
// and the values of earlier steps, in the units that the steps state. It knows
// nothing of how the values were computed.
func requireEvaluable(t testing.TB, c *beam.Check) {
	t.Helper()
	require.NotEmpty(t, c.Steps, "%s has no working", c.ID)
	known := map[string]float64{}
	for _, s := range c.Steps {
		v, err := s.Value.In(s.Unit)
		require.NoError(t, err, "%s: %s", c.ID, s.Symbol)
		if s.Expression != "" {
			got, err := expression.Evaluate(s.Expression, known)
			require.NoError(t, err, "%s: %s", c.ID, s.Symbol)
			require.InDelta(t, v, got, 1e-9*math.Max(math.Abs(v), 1e-3), "%s: %s = %s", c.ID, s.Symbol, s.Expression)
		}
		_, twice := known[s.Symbol]
		require.False(t, twice, "%s: %s has two values", c.ID, s.Symbol)
		known[s.Symbol] = v
	}
}

// requireSymbols asserts what a working shows, in order.
func requireSymbols(t testing.TB, c *beam.Check, want ...string) {
	t.Helper()
	var got []string
	for _, s := range c.Steps {
		got = append(got, s.Symbol)
	}
	require.Equal(t, want, got, c.ID)
}
