package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// Bars of two grades at a face: least steel and required steel go by the weaker,
// whichever row it is. 200/60000 × 14 × 21.625 in2.
func TestWeakestRowDecidesLeastSteel(t *testing.T) {
	for _, strong := range []int{0, 1, 2} {
		rows := []beam.Row{bottom(2, "#8"), bottom(2, "#8"), bottom(2, "#8"), top(2, "#4")}
		rows[0].Layer, rows[1].Layer, rows[2].Layer = 1, 2, 3
		for i := range 3 {
			rows[i].Yield = units.KSI.Of(80)
		}
		rows[strong].Yield = units.KSI.Of(60)
		r, trial := checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(150)})
		require.Equal(t, units.KSI.Of(60), faceYield(trial, beam.Positive))
		c := find1(t, r, "flexure.minimum.positive")
		d := trial.EffectiveDepth(beam.Positive).In(units.Inch)
		require.InEpsilon(t, 200.0/60000*14*d, valueIn(t, c.Demand, "in2"), 1e-9)
		for _, s := range c.Steps {
			if s.Symbol == "fy" {
				require.Equal(t, "the least of those at the tension face", s.Note)
			}
		}
		// 24.3.2 goes by the strongest of the nearest layer.
		want := units.KSI.Of(80)
		if strong == 0 {
			want = units.KSI.Of(60)
		}
		require.Equal(t, want, greatestYield(trial, beam.Bottom))
	}
}

// Two rows beside the web of different sizes, the outer beyond the spread: the
// inner counts alone. 4 #8, 2 #8 and 2 #9 beyond.
func TestRowsBesideTheWebCountEach(t *testing.T) {
	rows := []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 2, "#8", 7), flangeRow(beam.Top, 2, "#9", 6)}
	r, trial := check(t, ACI31819(), hoggingTee(20, 60), rows)
	require.InDelta(t, 4.74, valueIn(t, find1(t, r, "flexure.minimum.negative").Capacity, "in2"), 1e-9)
	area := 0.0
	for _, l := range ACI31819().e.trialSection(trial, beam.Negative).Layers {
		area += l.Area.In(units.SquareInch)
	}
	require.InDelta(t, 4.74, area, 1e-9)
	// One bar beyond alone takes nothing.
	r, _ = check(t, ACI31819(), hoggingTee(20, 60), []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 1, "#8", 12)})
	require.InDelta(t, 3.16, valueIn(t, find1(t, r, "flexure.minimum.negative").Capacity, "in2"), 1e-9)
}

// The worse of two outer parts governs, and checks by service loads name no
// combination.
func TestWorseOuterPart(t *testing.T) {
	rows := []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 2, "#8", 7), flangeRow(beam.Top, 3, "#4", 6)}
	r, _ := check(t, ACI31819(), hoggingTee(20, 60), rows)
	c := find1(t, r, "crack.flange-outer")
	require.InDelta(t, 0.20, valueIn(t, c.Capacity, "in2"), 1e-9, "two on the left, one on the right")
	require.Len(t, c.Steps, 5)
	for _, id := range []string{"crack.spacing", "crack.flange-spread", "crack.flange-spacing", "crack.flange-outer"} {
		require.Empty(t, find1(t, r, id).Combination, id)
		require.NotZero(t, find1(t, r, id).Span, id)
	}
	require.NotEmpty(t, find1(t, r, "crack.flange-spread").Reason)
	require.Len(t, find1(t, r, "crack.flange-spacing").Steps, 5)
	// With demands the spread is the flange.
	b := demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(-60)})
	b.Section = hoggingTee(20, 36).Section
	r, _ = check(t, ACI31819(), b, []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 2, "#8", 12)})
	steps := find1(t, r, "crack.flange-spacing").Steps
	require.Len(t, steps, 3)
	require.Contains(t, steps[0].Note, "not known")
}

// An ell has its flange on one side: bars belong beside the web there alone.
func TestFlangeOfAnEll(t *testing.T) {
	b := hoggingTee(40, 36)
	b.Section.Shape = beam.Ell
	r, _ := check(t, ACI31819(), b, []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 1, "#8", 10)})
	c := find1(t, r, "crack.flange-spread")
	require.Equal(t, 1.0, c.Demand.SI())
	require.Equal(t, beam.Pass, c.Outcome)
	// (36 - 12)/2 = 12 in. beyond the web, the bar at 7.375: 4.625 in. to the edge.
	require.InDelta(t, 10, valueIn(t, find1(t, r, "crack.flange-spacing").Demand, "in"), 1e-9)
	require.Equal(t, beam.Pass, find1(t, r, "crack.flange-spacing").Outcome)
}

// One bar at the left end of an isolated tee's flange, none at its right.
func TestCoverOfALoneFlangeBar(t *testing.T) {
	b := hoggingTee(20, 24)
	b.Section.Isolated, b.Section.FlangeThickness = true, in(8)
	for _, count := range []int{1, 2} {
		r, _ := check(t, ACI31819(), b, []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, count, "#8", 7)})
		require.InDelta(t, 1.125, valueIn(t, facesOf(r.Checks, "cover.bar", beam.Top)[0].Capacity, "in"), 1e-9)
	}
}

// Least steel says why a width was taken.
func TestLeastSteelSaysItsWidth(t *testing.T) {
	note := func(b beam.Brief) (symbols, notes string) {
		r, _ := check(t, ACI31819(), b, []beam.Row{bottom(4, "#8"), top(4, "#8"), flangeRow(beam.Top, 2, "#8", 7)})
		for _, s := range find1(t, r, "flexure.minimum.negative").Steps {
			symbols += s.Symbol + " "
			notes += s.Note
		}
		return symbols, notes
	}
	b := hoggingTee(20, 40)
	symbols, said := note(b)
	require.Contains(t, symbols, "bw bf b d As,a As,b As,min")
	require.Contains(t, said, "of a statically determinate beam")
	b.Supports[1] = beam.Support{Kind: statics.Roller, Width: in(12)}
	symbols, said = note(b)
	require.NotContains(t, symbols, "bf")
	require.Contains(t, said, "of a statically indeterminate beam")
	r, _ := checkUS(t, ACI31819(), []beam.Row{bottom(4, "#8"), top(2, "#4")}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	for _, s := range find1(t, r, "flexure.minimum.positive").Steps {
		require.Empty(t, s.Note)
	}
}

// Compression steel beside which tension steel is sized: with the displaced
// concrete kept, and under an axial tension, put back into the kernel.
func TestSteelBesideCompressionSteelUnderTension(t *testing.T) {
	relied := top(3, "#9")
	relied.InCompression = true
	for _, ignore := range []bool{false, true} {
		_, trial := checkUS(t, ACI31819(), []beam.Row{bottom(4, "#9"), relied}, func(b *beam.Brief) { b.Readings.IgnoreDisplaced = ignore },
			beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
		e := ACI31819().e
		for _, axial := range []float64{0, -20} {
			area, ok := e.requiredArea(trial, beam.Positive, units.KipFoot.Of(500), units.Kip.Of(axial))
			require.True(t, ok)
			s := mechanics.Section{Parts: trial.Geometry.Parts, Layers: []mechanics.Layer{
				{Depth: in(24 - 1.5 - 0.375 - 0.564), Area: area, Steel: e.barSteel(psi(60000))},
				{Depth: in(1.5 + 0.375 + 0.564), Area: in2(3), Steel: e.barSteel(psi(60000))},
			}}
			f, strain, err := e.flexureUnder(s, psi(4000), beam.Positive, &trial.Brief.Readings, units.Kip.Of(axial))
			require.NoError(t, err)
			require.InEpsilon(t, 500, f.Design.In(units.KipFoot), 1e-9, "%v kip", axial)
			require.LessOrEqual(t, strain, f.ExtremeStrain)
		}
	}
}
