package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
)

func briefOf(cases ...beam.LoadCase) *beam.Brief {
	b := new(beam.Brief)
	for _, c := range cases {
		b.Loads = append(b.Loads, beam.Load{Case: c})
	}
	return b
}

// 5.3.1 (a) to (g): which combinations stay for the cases loaded. Self-weight
// makes dead load always there.
func TestCombinationsKept(t *testing.T) {
	for _, tc := range []struct {
		name  string
		brief *beam.Brief
		want  []string
	}{
		{"self-weight alone", briefOf(), []string{"1.4D"}},
		{"dead and live", briefOf(beam.Dead, beam.Live), []string{"1.4D", "1.2D + 1.6L"}},
		{"snow", briefOf(beam.Snow), []string{"1.4D", "1.2D + 1.6S"}},
		{
			"live and snow", briefOf(beam.Live, beam.Snow),
			[]string{"1.4D", "1.2D + 1.6L", "1.2D + 1.6L + 0.5S", "1.2D + 1.6S + 1.0L", "1.2D + 1.6S"},
		},
		{
			"live and wind, both senses", briefOf(beam.Live, beam.Wind),
			[]string{
				"1.4D", "1.2D + 1.6L",
				"1.2D + 1.0W + 1.0L", "1.2D - 1.0W + 1.0L",
				"0.9D + 1.0W", "0.9D - 1.0W",
			},
		},
		{
			"live and earthquake, both senses", briefOf(beam.Live, beam.Earthquake),
			[]string{
				"1.4D", "1.2D + 1.6L",
				"1.2D + 1.0E + 1.0L", "1.2D - 1.0E + 1.0L",
				"0.9D + 1.0E", "0.9D - 1.0E",
			},
		},
		{
			"roof live and wind without live", briefOf(beam.RoofLive, beam.Wind),
			[]string{
				"1.4D", "1.2D + 1.6Lr", "1.2D + 1.6Lr + 0.5W", "1.2D + 1.6Lr - 0.5W",
				"1.2D + 1.0W + 0.5Lr", "1.2D - 1.0W + 0.5Lr", "1.2D + 1.0W", "1.2D - 1.0W",
				"0.9D + 1.0W", "0.9D - 1.0W",
			},
		},
		{"rain is an alternative of its own", briefOf(beam.Rain), []string{"1.4D", "1.2D + 1.6R"}},
		{"no dead load", &beam.Brief{NoSelfWeight: true, Loads: []beam.Load{{Case: beam.Live}}}, []string{"1.6L"}},
	} {
		t.Run(tc.name, func(t *testing.T) {
			kept, dropped := ACI31819().Combinations(tc.brief)
			var got []string
			for _, c := range kept {
				got = append(got, c.ID)
			}
			require.ElementsMatch(t, tc.want, got)
			for _, d := range dropped {
				require.NotEmpty(t, d.Reason)
				require.NotEmpty(t, d.Clause)
			}
		})
	}
}

func TestCombinationsOfEveryCase(t *testing.T) {
	kept, dropped := ACI31814M().Combinations(briefOf(beam.LoadCases()...))
	// (a) 1; (b) 3; (c) 3 with L and 3 with W in two senses; (d) 3 in two
	// senses; (e) 2; (f) 2; (g) 2: nothing coincides, nothing is dropped.
	require.Len(t, kept, 1+3+9+6+2+2+2)
	require.Empty(t, dropped)
	ids := map[string]bool{}
	for _, c := range kept {
		require.False(t, ids[c.ID], c.ID)
		ids[c.ID] = true
	}
	require.True(t, ids["1.2D - 1.0E + 1.0L + 0.2S"])
	require.True(t, ids["1.2D + 1.6R - 0.5W"])
}

func TestCombinationFactors(t *testing.T) {
	kept, _ := ACI31819().Combinations(briefOf(beam.Live, beam.Wind))
	require.Equal(t, []beam.CaseFactor{{Case: beam.Dead, Factor: 1.2}, {Case: beam.Wind, Factor: -1}, {Case: beam.Live, Factor: 1}}, kept[3].Factors)
	require.Equal(t, "5.3.1(d)", kept[3].Clause)
}

func TestDroppedCombinationsSayWhy(t *testing.T) {
	_, dropped := ACI31819().Combinations(briefOf(beam.Live))
	reasons := map[string]string{}
	for _, d := range dropped {
		reasons[d.ID] = d.Reason
	}
	require.Equal(t, "the brief has no wind load, which leads it", reasons["0.9D ± 1.0W"])
	require.Equal(t, "the brief has no snow load, which leads it", reasons["1.2D + 1.6S ± 0.5W"])
	require.Equal(t, "without snow load it is the same as 1.2D + 1.6L", reasons["1.2D + 1.6L + 0.5S"])
}

func TestNoCombinationsForDemands(t *testing.T) {
	kept, dropped := ACI31819().Combinations(&beam.Brief{Demands: []beam.Demand{{Name: "1"}}})
	require.Empty(t, kept)
	require.Empty(t, dropped)
}
