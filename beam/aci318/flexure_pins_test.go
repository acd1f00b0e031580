package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// Tension reinforcement is what is stretched farther than two-thirds of the depth
// from the compression face (commentary to Table 22.5.5.1): not at it, and no
// layer that is pressed or has no strain.
func TestWhatIsNoTensionReinforcement(t *testing.T) {
	e := ACI31819().e
	s := mechanics.Section{Parts: mechanics.Rectangle(in(12), in(24))}
	var u mechanics.Ultimate
	for _, l := range []struct {
		depth  units.Length
		strain float64
	}{{in(24).Scale(2.0 / 3), -0.001}, {in(18), 0}, {in(19), 0.0005}, {in(22), -0.004}} {
		s.Layers = append(s.Layers, mechanics.Layer{Depth: l.depth, Area: in2(1), Steel: e.barSteel(psi(60000))})
		u.Layers = append(u.Layers, mechanics.LayerState{Depth: l.depth, Strain: l.strain})
	}
	area, depth := tensionSide(&u, s)
	require.InDelta(t, 1, area.In(units.SquareInch), 1e-12)
	require.InDelta(t, 22, depth.In(units.Inch), 1e-12)
	// Nor does a layer of no strain class the section (21.2.2).
	s.Layers[1].Steel.Yield = psi(80000)
	require.Equal(t, psi(60000), tensionYield(s, &u))
}

// A law that is kept is that of the same block (22.2.2.4.3), and a concrete of no
// strength has none.
func TestLawOfTheBlockIsKept(t *testing.T) {
	e := ACI31819().e
	for _, tc := range []struct {
		off  float64
		kept bool
	}{{0, true}, {1e-9, false}} {
		law, err := mechanics.RectangularBlock(psi(3400), 0.85+tc.off, crushing)
		require.NoError(t, err)
		got, err := e.reblock(law, psi(4000))
		require.NoError(t, err)
		_, before := law.Resultant()
		_, after := got.Resultant()
		require.InDelta(t, 0.425, after, 1e-15)
		require.Equal(t, tc.kept, before == after)
	}
	_, trial := checkUS(t, ACI31819(), []beam.Row{bottom(3, "#9"), top(3, "#9")}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	trial.Brief.Concrete.Strength = units.Stress{}
	_, ok := e.trialFlexure(trial, beam.Positive)
	require.False(t, ok)
}

// Where the compression face has bars that count, the layers are more than the
// rows of the face in tension: all of them are kept (24.3.4).
func TestLayersBeyondTheRowsOfAFace(t *testing.T) {
	relied := bottom(2, "#5")
	relied.InCompression = true
	_, trial := check(t, ACI31819(), hoggingTee(20, 60), []beam.Row{relied, top(4, "#8"), flangeRow(beam.Top, 2, "#8", 7)})
	area := 0.0
	for _, l := range ACI31819().e.trialSection(trial, beam.Negative).Layers {
		area += l.Area.In(units.SquareInch)
	}
	require.InDelta(t, 2*0.31+6*0.79, area, 1e-9)
}

// The widest gap of 24.3.4 in a flange of two unequal sides, in inches: a web of
// 12 in. with bars at 2 and 10, and bars beside it.
func TestWidestGapOfAFlange(t *testing.T) {
	b := demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(-60)})
	b.Section = hoggingTee(20, 36).Section
	_, trial := check(t, ACI31819(), b, []beam.Row{bottom(2, "#5"), top(4, "#8")})
	for _, tc := range []struct {
		name        string
		left, right float64 // where the spread ends
		bars        []float64
		want        float64
	}{
		{"to the left edge", 12, 0, nil, 2 + 12},
		{"to the right edge", 0, 14, nil, 14 + 2},
		{"between bars", 0, 0, nil, 8},
		{"a bar on the left", 12, 0, []float64{-3}, 9},
		{"a bar on the left beyond its side alone", 4, 12, []float64{-6}, 14},
		{"a bar on the right", 0, 14, []float64{21}, 11},
		{"a bar on the right beyond its side", 0, 6, []float64{21}, 8},
	} {
		n := nearestBars{web: []bars.Placed{{X: in(2)}, {X: in(10)}}}
		for _, x := range tc.bars {
			n.flange = append(n.flange, beam.FlangeBar{X: in(x)})
			if x < 0 {
				n.left++
			}
		}
		sides := [2]flangeSide{{to: in(tc.left), reach: in(tc.left), needs: tc.left > 0}, {to: in(tc.right), reach: in(tc.right), needs: tc.right > 0}}
		require.InDelta(t, tc.want, n.widest(trial, &sides).In(units.Inch), 1e-9, tc.name)
		for i := range n.len() {
			_, x, _, beside := n.at(i)
			require.Equal(t, x.In(units.Inch) < 0 || x.In(units.Inch) > 12, beside, tc.name)
		}
	}
}

// A bar lies on the side of the web's middle on which its centre is.
func TestSideOfAFlangeBar(t *testing.T) {
	_, trial := check(t, ACI31819(), hoggingTee(20, 60), []beam.Row{bottom(2, "#5"), top(4, "#8")})
	for _, tc := range []struct {
		x    float64
		side int
		out  float64
	}{{-3, 0, 3}, {5.99, 0, -5.99}, {6, 1, -6}, {6.01, 1, -5.99}, {15, 1, 3}} {
		side, out := trial.Beside(&beam.FlangeBar{X: in(tc.x)})
		require.Equal(t, tc.side, side, "%v", tc.x)
		require.InDelta(t, tc.out, out.In(units.Inch), 1e-9)
	}
}

// Of two outer parts the worse is judged, whichever it is (24.4.3): 0.0018 × 4 in.
// of flange against one bar on the worse side and two on the other.
func TestWorseOuterPartOnEitherSide(t *testing.T) {
	_, trial := check(t, ACI31819(), hoggingTee(20, 60), []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 2, "#8", 7)})
	e := ACI31819().e
	size := trial.Top.Largest
	sides, _ := flangeSides(trial, beam.Top)
	for _, x := range [][]float64{{-20, -20, 32}, {-20, 32, 32}} {
		trial.Top.Flange = nil
		for _, at := range x {
			trial.Top.Flange = append(trial.Top.Flange, beam.FlangeBar{Size: size, X: in(at), Y: in(2)})
		}
		c := e.judgeOuter(nil, trial, beam.Negative, &beam.Action{Span: 1}, &sides)[0]
		require.InDelta(t, 0.79, valueIn(t, c.Capacity, "in2"), 1e-9)
		require.InDelta(t, 0.0018*4*sides[0].over.Sub(sides[0].to).In(units.Inch), valueIn(t, c.Demand, "in2"), 1e-9)
	}
}
