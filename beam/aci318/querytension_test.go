package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// layersAt are layers of Grade 60 steel: area in in2 and depth in in.
func layersAt(pairs ...[2]float64) (out []beam.SteelLayer) {
	for _, p := range pairs {
		out = append(out, beam.SteelLayer{Area: in2(p[0]), Depth: in(p[1]), Yield: psi(60000)})
	}
	return out
}

// A bare section under an axial tension that pulls on the steel of both halves is
// held to 22.4.3.1, with a moment or without: by statics of the force at
// mid-depth of 14 by 24 in, the share of the top is N - (N (12 - d') + M)/(d - d')
// and its strength 0.9 As fy; without steel at the top the share acts at the face
// and has none.
func TestQueryOfTensionOnBothFaces(t *testing.T) {
	for _, tc := range []struct {
		name           string
		layers         []beam.SteelLayer
		moment, pull   float64 // kip-ft, kip
		bottom, top    float64 // shares in kip
		haveB, haveT   float64 // in2
		judged, passes bool
	}{
		{"a layer far from the force", layersAt([2]float64{3, 21.5}), 1, 100, (100*12 + 12) / 21.5, 100 - (100*12+12)/21.5, 3, 0, true, false},
		{"too little at the top", layersAt([2]float64{3, 21.5}, [2]float64{0.4, 2.5}), 5, 100, (100*9.5 + 60) / 19, 100 - (100*9.5+60)/19, 3, 0.4, true, false},
		{"enough at the top", layersAt([2]float64{3, 21.5}, [2]float64{1, 2.5}), 5, 100, (100*9.5 + 60) / 19, 100 - (100*9.5+60)/19, 3, 1, true, true},
		{"no moment, one layer", layersAt([2]float64{1, 21.5}), 0, 53, 53 * 12 / 21.5, 53 - 53*12/21.5, 1, 0, true, false},
		{"more than the steel has", layersAt([2]float64{1, 21.5}), 0, 59, 59 * 12 / 21.5, 59 - 59*12/21.5, 1, 0, true, false},
		{"no moment, both faces", layersAt([2]float64{1, 21.5}, [2]float64{1, 2.5}), 0, 100, 50, 50, 1, 1, true, true},
		{"one layer under the force", layersAt([2]float64{1, 12}), 0, 50, 50, 0, 1, 0, true, true},
		{"bending beyond the bottom steel", layersAt([2]float64{3, 21.5}), 100 * 9.5 / 12 * 1.001, 100, 0, 0, 0, 0, false, true},
		{"just at the bottom steel", layersAt([2]float64{3, 21.5}), 100 * 9.5 / 12, 100, 0, 0, 0, 0, false, true},
		{"within the bottom steel", layersAt([2]float64{3, 21.5}, [2]float64{1, 2.5}), 100 * 9.5 / 12 * 0.999, 100, (100*9.5 + 100*9.5*0.999) / 19, 100 - (100*9.5+100*9.5*0.999)/19, 3, 1, true, true},
		{"a hogging moment", layersAt([2]float64{1, 21.5}, [2]float64{1, 2.5}), -20, 80, (80*9.5 - 240) / 19, 80 - (80*9.5-240)/19, 1, 1, true, true},
		{"hogging beyond the top steel", layersAt([2]float64{1, 21.5}, [2]float64{3, 2.5}), -70, 80, 0, 0, 0, 0, false, true},
		{"several layers a half", layersAt([2]float64{1, 21.5}, [2]float64{1, 18.5}, [2]float64{1, 2.5}), 0, 90, 90 * 9.5 / 17.5, 90 - 90*9.5/17.5, 2, 1, true, true},
	} {
		for _, c := range Editions() {
			if c.e.system == units.SI {
				continue
			}
			q := teeQuery()
			q.Section = rectangle(in(14), in(24))
			q.Layers = tc.layers
			if tc.moment < 0 {
				q.Bending = beam.Negative
			}
			q.Demand = beam.Demand{Name: "pull", Shear: units.Kip.Of(1), Moment: units.KipFoot.Of(tc.moment), Axial: units.Kip.Of(-tc.pull)}
			s, err := c.Strengths(q)
			require.NoError(t, err, tc.name)
			shares := checksOf(s.Checks, "flexure.tension")
			if !tc.judged {
				require.Empty(t, shares, tc.name)
				continue
			}
			require.Len(t, shares, 2, tc.name)
			require.InDelta(t, tc.bottom, valueIn(t, shares[0].Demand, "kip"), 1e-9, tc.name)
			require.InDelta(t, tc.top, valueIn(t, shares[1].Demand, "kip"), 1e-9, tc.name)
			require.InDelta(t, 54*tc.haveB, valueIn(t, shares[0].Capacity, "kip"), 1e-9, tc.name)
			require.InDelta(t, 54*tc.haveT, valueIn(t, shares[1].Capacity, "kip"), 1e-9, tc.name)
			require.Equal(t, []beam.Face{beam.Bottom, beam.Top}, []beam.Face{shares[0].Face, shares[1].Face})
			require.Equal(t, "pull", shares[0].Combination)
			require.Equal(t, "22.4.3.1", shares[1].Clause)
			require.Equal(t, tc.passes, shares[0].Outcome == beam.Pass && shares[1].Outcome == beam.Pass, tc.name)
		}
	}
	// A compression, or nothing, pulls on no face.
	for _, axial := range []float64{0, 10} {
		q := teeQuery()
		q.Demand = beam.Demand{Shear: units.Kip.Of(1), Axial: units.Kip.Of(axial)}
		s, err := ACI31819().Strengths(q)
		require.NoError(t, err)
		require.Empty(t, checksOf(s.Checks, "flexure.tension"))
	}
	// Steel of two grades at a half counts with the lesser.
	q := teeQuery()
	q.Section = rectangle(in(14), in(24))
	q.Layers = layersAt([2]float64{1, 21.5}, [2]float64{1, 21}, [2]float64{1, 2.5})
	q.Layers[1].Yield = psi(40000)
	q.Demand = beam.Demand{Axial: units.Kip.Of(-10)}
	s, err := ACI31819().Strengths(q)
	require.NoError(t, err)
	require.InEpsilon(t, 0.9*2*40, valueIn(t, checksOf(s.Checks, "flexure.tension")[0].Capacity, "kip"), 1e-12)
}

// An axial tension near all that the steel can pull with ends in checks, never in
// a fault of the input.
func TestQueryNearTheLimitOfTension(t *testing.T) {
	for _, c := range Editions() {
		for _, sense := range []beam.Sense{beam.Positive, beam.Negative} {
			for k := -4; k <= 4; k++ {
				q := teeQuery()
				q.Section = rectangle(in(14), in(24))
				q.Layers = layersAt([2]float64{1, 21.5}, [2]float64{0.2, 3})
				q.Bending = sense
				q.Demand = beam.Demand{Name: "1", Axial: units.Kip.Of(-1.2 * 54 * (1 + float64(k)*1e-12))}
				s, err := c.Strengths(q)
				require.NoError(t, err)
				require.Len(t, checksOf(s.Checks, "flexure.tension"), 2)
				require.GreaterOrEqual(t, s.Flexure.Design.In(units.KipFoot), 0.0)
			}
		}
	}
}
