package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// Compression steel of RequiredSteel yields where the strain at its depth reaches
// fy/Es: with the neutral axis of 318-19 at 22 × 3/(3 + 5.069) = 8.18 in, at
// 0.31 of it or nearer the face; it displaces concrete only inside the block.
func TestCompressionSteelRequired(t *testing.T) {
	at := func(top float64, ignore bool, grade float64) RequiredSteel {
		s, err := ACI31819().RequiredSteel(SteelQuery{
			Section: beam.Section{Width: in(14), Depth: in(24.5)}, Depth: in(22), Top: in(top), Strength: psi(4000), Yield: psi(grade),
			Moment: units.KipFoot.Of(600), Readings: beam.Readings{IgnoreDisplaced: ignore},
		})
		require.NoError(t, err)
		return s
	}
	strain := 60.0/29000 + 0.003
	c := 22 * 0.003 / (0.003 + strain)
	a := 0.85 * c
	alone := 0.85 * 4 * 14 * a * (22 - a/2)
	for _, tc := range []struct {
		top    float64
		ignore bool
		yields bool
	}{{2, false, true}, {2, true, true}, {3, false, false}, {3, true, false}, {7.5, false, false}, {7.5, true, false}} {
		s := at(tc.top, tc.ignore, 60000)
		stress := min(60, 29000*0.003*(c-tc.top)/c)
		net := stress
		if tc.top < a && !tc.ignore {
			net -= 3.4
		}
		pressure := (7200/0.9 - alone) / (net * (22 - tc.top))
		require.Equal(t, tc.yields, s.CompressionYields, "%v", tc)
		require.InEpsilon(t, stress, s.CompressionStress.In(units.KSI), 1e-9)
		require.InEpsilon(t, pressure, s.Compression.In(units.SquareInch), 1e-9)
		require.InEpsilon(t, (3.4*14*a+pressure*net)/60, s.Tension.In(units.SquareInch), 1e-9)
	}
	// What is left out is a rectangle in positive bending, and depths at their
	// bounds are taken.
	q := SteelQuery{Section: beam.Section{Width: in(14), Depth: in(24)}, Depth: in(22), Extreme: in(24), Strength: psi(4000), Yield: psi(60000), Moment: units.KipFoot.Of(200)}
	s, err := ACI31819().RequiredSteel(q)
	require.NoError(t, err)
	require.Positive(t, s.Tension.In(units.SquareInch))
	q.Section = beam.Section{Shape: beam.Tee, Width: in(12), Depth: in(24), FlangeWidth: in(60), FlangeThickness: in(4)}
	unsaid, err := ACI31819().RequiredSteel(q)
	require.NoError(t, err)
	q.Bending = beam.Positive
	said, err := ACI31819().RequiredSteel(q)
	require.NoError(t, err)
	require.Equal(t, said, unsaid)
	q.Top = in(22)
	_, err = ACI31819().RequiredSteel(q)
	require.ErrorContains(t, err, "less than that of the tension steel")
}

// The widest spacing of Table 9.7.6.2.2: d/2, and no more than 24 in. or 600 mm.
func TestWidestSpacingOfStirrups(t *testing.T) {
	require.InDelta(t, 11, ACI31819().WidestSpacing(nil, in(22)).In(units.Inch), 1e-9)
	require.InDelta(t, 24, ACI31819().WidestSpacing(nil, in(60)).In(units.Inch), 1e-9)
	require.InDelta(t, 600, ACI31819M().WidestSpacing(nil, units.Millimetre.Of(2000)).In(units.Millimetre), 1e-9)
}

// The bound of the tension steel is a shade below what strength asks for.
func TestLeastTensionIsAShadeLess(t *testing.T) {
	_, trial := checkUS(t, ACI31819(), []beam.Row{bottom(3, "#9"), top(2, "#4")}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(200)})
	e := ACI31819().e
	d := trial.EffectiveDepth(beam.Positive)
	least, ok := e.leastTension(trial.Problem, beam.Positive, d)
	require.True(t, ok)
	need, ok := e.requiredArea(trial, beam.Positive, units.KipFoot.Of(200), units.Force{})
	require.True(t, ok)
	require.Less(t, least.Ratio(need), 1.0)
	require.InDelta(t, 1-2e-9, least.Ratio(need), 1e-9)
}

// A tension that acts below the steel of a face asks of it no more than all of
// itself at its yield strength, and of no moment no steel is asked.
func TestSteelOfTensionAlone(t *testing.T) {
	_, trial := checkUS(t, ACI31819(), []beam.Row{bottom(3, "#9"), top(3, "#9")}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	e := ACI31819().e
	for _, tc := range []struct{ moment, axial, want float64 }{
		{0, 0, 0}, {0, -54, 1}, {10, -54, 1}, {0, 10, 0},
	} {
		area, ok := e.requiredArea(trial, beam.Positive, units.KipFoot.Of(tc.moment), units.Kip.Of(tc.axial))
		require.True(t, ok, "%v", tc)
		require.InDelta(t, tc.want, area.In(units.SquareInch), 1e-9, "%v", tc)
	}
	// Too much for any steel, with and without a force.
	for _, axial := range []float64{0, -10} {
		_, ok := e.requiredArea(trial, beam.Positive, units.KipFoot.Of(2000), units.Kip.Of(axial))
		require.False(t, ok)
	}
}

// The centroid and the extreme layer of steel that counts: bars of two heights in
// the web, bars beside it within the spread and beyond.
func TestSteelThatCounts(t *testing.T) {
	second := top(2, "#8")
	second.Layer, second.Mark = 2, "T2"
	_, trial := check(t, ACI31819(), hoggingTee(20, 60), []beam.Row{bottom(2, "#5"), top(4, "#8"), second, flangeRow(beam.Top, 4, "#9", 5)})
	steel := tensionSteel(trial, beam.Negative)
	y1 := 1.5 + 0.375 + 0.5
	y2, yf := trial.Top.Rows[1].Height.In(units.Inch), trial.Top.Flange[0].Y.In(units.Inch)
	require.InEpsilon(t, 6*0.79+2*1.0, steel.area.In(units.SquareInch), 1e-12)
	require.InEpsilon(t, 24-(4*0.79*y1+2*0.79*y2+2*yf)/6.74, steel.depth.In(units.Inch), 1e-9)
	require.InEpsilon(t, 24-min(y1, yf), steel.extreme.In(units.Inch), 1e-9)
	// Without any beyond it is what the trial itself says.
	_, trial = check(t, ACI31819(), hoggingTee(20, 60), []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 2, "#9", 5)})
	require.False(t, beyondSpread(trial, beam.Negative))
	steel = tensionSteel(trial, beam.Negative)
	require.Equal(t, faceSteel{trial.Top.Area, trial.EffectiveDepth(beam.Negative), trial.ExtremeDepth(beam.Negative)}, steel)
	// Where none counts, the depths are of those that are there.
	trial.Top.Fit.Bars, trial.Top.Flange = nil, []beam.FlangeBar{{Size: trial.Top.Largest, X: in(40), Y: in(2)}}
	steel = tensionSteel(trial, beam.Negative)
	require.True(t, steel.area.IsZero())
	require.Equal(t, trial.EffectiveDepth(beam.Negative), steel.depth)
}

// A concrete of which every layer is pressed is classed by its strongest.
func TestStrongestOfPressedLayers(t *testing.T) {
	e := ACI31819().e
	s := mechanics.Section{Parts: mechanics.Rectangle(in(12), in(24)), Layers: []mechanics.Layer{
		{Depth: in(3), Area: in2(1), Steel: e.barSteel(psi(60000))}, {Depth: in(4), Area: in2(1), Steel: e.barSteel(psi(80000))}, {Depth: in(5), Area: in2(1), Steel: e.barSteel(psi(40000))},
	}}
	u := mechanics.Ultimate{Layers: []mechanics.LayerState{{Strain: 0.001}, {Strain: 0.001}, {Strain: 0.001}}}
	require.Equal(t, psi(80000), tensionYield(s, &u))
	u.Layers[2].Strain = -0.001
	require.Equal(t, psi(40000), tensionYield(s, &u))
}
