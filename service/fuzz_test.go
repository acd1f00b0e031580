package service_test

import (
	"encoding/json"
	"net/http"
	"slices"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/service"
)

// fuzzDoor sends whatever comes to a door: it must answer with a complete
// JSON document, never with a fault of its own, and a problem must name what
// is wrong.
func fuzzDoor(f *testing.F, path string, bad []badInput, seeds ...string) {
	s := newService(f, func(o *service.Options) { o.Limits.Body = 16 << 10 })
	for _, seed := range seeds {
		f.Add(seed)
	}
	for _, tc := range bad {
		request := tc.request
		if request == "" {
			request = seeds[0]
		}
		f.Add(strings.Replace(request, tc.replace, tc.with, 1))
	}
	f.Fuzz(func(t *testing.T, body string) {
		if dear(body) {
			return
		}
		w := send(s, "POST", path, body, "Content-Type", "application/json")
		require.True(t, json.Valid(w.Body.Bytes()), "%q", w.Body)
		switch w.Code {
		case http.StatusOK:
			require.Equal(t, w.Body.String(), send(s, "POST", path, body, "Content-Type", "application/json").Body.String())
		case http.StatusBadRequest, http.StatusUnprocessableEntity:
			require.NotEmpty(t, problemOf(t, w).Errors)
		case http.StatusRequestEntityTooLarge:
		default:
			require.Fail(t, "unexpected status", "%d for %q: %s", w.Code, body, w.Body)
		}
	})
}

// dear reports whether a body asks for a long search: many depths to try.
func dear(body string) bool { return strings.Count(body, `"depths"`) > 0 || len(body) > 8<<10 }

func FuzzDesigns(f *testing.F) {
	fuzzDoor(f, "/v1/designs", slices.Concat(onBrief(), onSections(), onTorques()), goodBrief, goodDemands,
		of(goodBrief, tee), of(goodBrief, floorTee), of(goodBrief, ledges), of(goodBrief, box), of(goodDemands, tee),
		strings.Replace(goodBrief, `"loads": [`, `"loads": [{"case": "dead", "shape": "torque", "moment": "24 kip-ft", "at": "13.5 ft", "path": "compatibility"},`, 1))
}

func FuzzChecks(f *testing.F) {
	fuzzDoor(f, "/v1/checks", append(onOtherDoors()["/v1/checks"], onLayouts()...), goodCheck, of(goodCheck, tee), of(goodCheck, box))
}

func FuzzStrengths(f *testing.F) {
	fuzzDoor(f, "/v1/strengths", append(onOtherDoors()["/v1/strengths"], onBareSections()...), goodStrengths,
		of(goodStrengths, tee), of(goodStrengths, ledges), of(goodStrengths, box), strings.Replace(goodStrengths, `"0 kip-ft"`, `"30 kip-ft"`, 1))
}

func FuzzFits(f *testing.F) { fuzzDoor(f, "/v1/fits", onOtherDoors()["/v1/fits"], goodFits) }
