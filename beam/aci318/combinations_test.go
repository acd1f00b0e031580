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

// 5.3.1(a) to (g) as printed, each alternative of roof live load, snow and rain
// written out, with wind and earthquake acting one way.
func TestFactorsAsPrinted(t *testing.T) {
	const d, l, w, e = beam.Dead, beam.Live, beam.Wind, beam.Earthquake
	type factors map[beam.LoadCase]float64
	want := map[string][]factors{"5.3.1(a)": {{d: 1.4}}}
	for _, r := range []beam.LoadCase{beam.RoofLive, beam.Snow, beam.Rain} {
		want["5.3.1(b)"] = append(want["5.3.1(b)"], factors{d: 1.2, l: 1.6, r: 0.5})
		want["5.3.1(c)"] = append(want["5.3.1(c)"], factors{d: 1.2, r: 1.6, l: 1}, factors{d: 1.2, r: 1.6, w: 0.5}, factors{d: 1.2, r: 1.6, w: -0.5})
		want["5.3.1(d)"] = append(want["5.3.1(d)"], factors{d: 1.2, w: 1, l: 1, r: 0.5}, factors{d: 1.2, w: -1, l: 1, r: 0.5})
	}
	want["5.3.1(e)"] = []factors{{d: 1.2, e: 1, l: 1, beam.Snow: 0.2}, {d: 1.2, e: -1, l: 1, beam.Snow: 0.2}}
	want["5.3.1(f)"] = []factors{{d: 0.9, w: 1}, {d: 0.9, w: -1}}
	want["5.3.1(g)"] = []factors{{d: 0.9, e: 1}, {d: 0.9, e: -1}}
	for _, c := range Editions() {
		kept, _ := c.Combinations(briefOf(beam.LoadCases()...))
		got := map[string][]factors{}
		for _, k := range kept {
			f := factors{}
			for _, x := range k.Factors {
				f[x.Case] = x.Factor
			}
			got[k.Clause] = append(got[k.Clause], f)
		}
		require.Len(t, got, len(want), c.e.id)
		for clause := range want {
			require.ElementsMatch(t, want[clause], got[clause], "%s %s", c.e.id, clause)
		}
	}
}

// A combination that says nothing new is dropped once for both senses where its
// reversible load is absent, and once a sense where it is there.
func TestDroppedCombinationsOfBothSenses(t *testing.T) {
	reasons := func(b *beam.Brief) map[string]string {
		_, dropped := ACI31819().Combinations(b)
		out := map[string]string{}
		for _, d := range dropped {
			out[d.ID] = d.Reason
		}
		return out
	}
	snow := reasons(briefOf(beam.Snow))
	require.Equal(t, "without wind load it is the same as 1.2D + 1.6S", snow["1.2D + 1.6S ± 0.5W"])
	wind := reasons(briefOf(beam.Wind))
	require.Equal(t, "without live and snow load it is the same as 1.2D + 1.0W", wind["1.2D + 1.0W + 1.0L + 0.5S"])
	require.Equal(t, "without live and snow load it is the same as 1.2D - 1.0W", wind["1.2D - 1.0W + 1.0L + 0.5S"])
}

// A load that may act either way may stand first in a combination.
func TestReversibleLoadFirst(t *testing.T) {
	e := us19
	e.loads = loadRules{[]printedCombination{{"own", beam.Wind, []term{{factor: 1, load: beam.Wind, reversible: true}, {factor: 0.9, load: beam.Dead}}}}}
	kept, dropped := e.combinations(briefOf(beam.Wind))
	require.Empty(t, dropped)
	require.Len(t, kept, 2)
	require.Equal(t, "1.0W + 0.9D", kept[0].ID)
	require.Equal(t, "-1.0W + 0.9D", kept[1].ID)
	require.Equal(t, -1.0, kept[1].Factors[0].Factor)
	_, dropped = e.combinations(briefOf(beam.Live))
	require.Equal(t, "±1.0W + 0.9D", dropped[0].ID)
}

// Loads of no known case are nobody's.
func TestUnknownCasesLoadNothing(t *testing.T) {
	loaded := loadedCases(&beam.Brief{NoSelfWeight: true, Loads: []beam.Load{{Case: 0}, {Case: beam.Earthquake + 1}}})
	for c, is := range loaded {
		require.False(t, is, c)
	}
}
