package rederive

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

func inches(v float64) units.Length { return units.Inch.Of(v) }

func corners(xy ...float64) (out []beam.Point) {
	for i := 0; i < len(xy); i += 2 {
		out = append(out, beam.Point{X: inches(xy[i]), Y: inches(xy[i+1])})
	}
	return out
}

// of is the shape of a section with a clear span, in inches.
func of(s beam.Section, clear float64) *shape {
	b := beam.Brief{Section: s}
	if clear > 0 {
		b.Spans, b.Supports = []units.Length{inches(clear)}, make([]beam.Support, 2)
	}
	return inch.shapeOf(&b)
}

// TestShapes measures sections whose areas, centroids and perimeters have
// closed forms of plane geometry.
func TestShapes(t *testing.T) {
	tee := beam.Section{Shape: beam.Tee, Width: inches(12), Depth: inches(24), FlangeThickness: inches(4), FlangeWidth: inches(48)}
	s := of(tee, 0)
	require.InDelta(t, 12*24+36*4, s.gross, 1e-9)
	require.InDelta(t, (12*24*12+36*4*2.0)/432, s.centroid, 1e-9)
	require.InDelta(t, 2*(48+24), s.perimeter, 1e-9)
	require.InDeltaSlice(t, []float64{12, 48}, s.faces[:], 1e-9)
	require.Equal(t, 1, s.flange)
	require.InDelta(t, 12, s.bw, 1e-9)

	tee.Shape = beam.InvertedTee
	s = of(tee, 0)
	require.InDelta(t, 24-(12*24*12+36*4*2.0)/432, s.centroid, 1e-9)
	require.InDeltaSlice(t, []float64{48, 12}, s.faces[:], 1e-9)
	require.Equal(t, 0, s.flange)

	s = of(beam.Section{Shape: beam.Polygon, Outline: corners(0, 0, 10, 0, 14, 20, -2, 20)}, 0)
	require.InDelta(t, 260, s.gross, 1e-9)
	require.InDelta(t, 20.0/3*(16+2*10)/(16+10), s.centroid, 1e-9)
	require.InDelta(t, 26+math.Hypot(4, 20)+math.Hypot(2, 20), s.perimeter, 1e-9)
	require.InDelta(t, 10, s.strip, 1e-9)
	require.InDelta(t, 10, s.bw, 1e-9)

	s = of(beam.Section{Shape: beam.Polygon, Outline: corners(5, 5, 35, 5, 35, 45, 5, 45), Voids: [][]beam.Point{corners(11, 10, 11, 37, 28, 37, 28, 10)}}, 0)
	require.InDelta(t, 1200-17*27, s.gross, 1e-9)
	require.InDelta(t, 1200, s.enclosed, 1e-9)
	require.InDelta(t, (1200*20-17*27*(8+13.5))/(1200-17*27), s.centroid, 1e-9)
	require.InDelta(t, 13, s.bw, 1e-9)
	require.InDelta(t, 30, s.strip, 1e-9)
	require.InDelta(t, 6, s.side, 1e-9)
	require.InDelta(t, 8, s.above, 1e-9)
	require.InDelta(t, 5, s.low, 1e-9)
}

// TestSlabs finds the width of flanges (ACI 318-19 Table 6.3.2.1) with each of
// the three limits least in turn.
func TestSlabs(t *testing.T) {
	for _, c := range []struct {
		name              string
		thick, clear      float64
		left, right       float64
		wantLeft, wantRgt float64
	}{
		{"eight thicknesses", 4, 400, 200, 80, 32, 32},
		{"half the distance", 6, 400, 60, 80, 30, 40},
		{"an eighth of the span", 6, 200, 200, 200, 25, 25},
		{"edge, six thicknesses", 4, 400, 200, 0, 24, 0},
		{"edge, half the distance", 6, 600, 50, 0, 25, 0},
		{"edge, a twelfth of the span", 6, 240, 0, 200, 0, 20},
	} {
		t.Run(c.name, func(t *testing.T) {
			shape := beam.Tee
			if c.left*c.right == 0 {
				shape = beam.Ell
			}
			s := of(beam.Section{
				Shape: shape, Width: inches(12), Depth: inches(30), FlangeThickness: inches(c.thick),
				Slab: beam.Slab{ClearLeft: inches(c.left), ClearRight: inches(c.right)},
			}, c.clear)
			require.InDelta(t, c.wantLeft, s.over[0], 1e-9)
			require.InDelta(t, c.wantRgt, s.over[1], 1e-9)
		})
	}
}

// TestTeeStrength holds strain compatibility against the closed forms of
// flanged and doubly reinforced sections with yielding steel: C = 0.85f'c(bf -
// bw)hf at hf/2 and the web the rest.
func TestTeeStrength(t *testing.T) {
	const fc, fy = 4000.0, 60000.0
	tee := of(beam.Section{Shape: beam.Tee, Width: inches(12), Depth: inches(27), FlangeThickness: inches(4), FlangeWidth: inches(30)}, 0)
	f := &fibres{p: &inch, s: tee, face: 1, fc: fc, deduct: true}

	as, d := 3.0, 24.0
	a := as * fy / (0.85 * fc * 30)
	s := f.strength([]steelAt{{d, as, fy}}, 0)
	require.InEpsilon(t, as*fy*(d-a/2), s.mn, 1e-9)
	require.InEpsilon(t, a/0.85, s.c, 1e-9)

	as = 8
	flange := 0.85 * fc * (30 - 12) * 4
	a = (as*fy - flange) / (0.85 * fc * 12)
	s = f.strength([]steelAt{{d, as, fy}}, 0)
	require.InEpsilon(t, flange*(d-2)+(as*fy-flange)*(d-a/2), s.mn, 1e-9)

	// Upside down: the web is pressed, over its own width alone.
	f.face = 0
	as = 3
	a = as * fy / (0.85 * fc * 12)
	s = f.strength([]steelAt{{d, as, fy}}, 0)
	require.InEpsilon(t, as*fy*(d-a/2), s.mn, 1e-9)

	// Two layers that yield on both sides of a rectangle.
	f = &fibres{p: &inch, s: of(beam.Section{Shape: beam.Rectangular, Width: inches(14), Depth: inches(24)}, 0), face: 1, fc: fc, deduct: true}
	top := 2.0
	as = 8
	a = (as*fy - top*(fy-0.85*fc)) / (0.85 * fc * 14)
	s = f.strength([]steelAt{{21.5, as, fy}, {2.5, top, fy}}, 0)
	require.Less(t, 0.00207, 0.003*(s.c-2.5)/s.c)
	require.InEpsilon(t, 0.85*fc*14*a*(21.5-a/2)+top*(fy-0.85*fc)*(21.5-2.5), s.mn, 1e-9)

	// An axial force on a section with yielding steel, about mid-depth.
	pu := 60000.0
	s = f.strength([]steelAt{{21.5, 3, fy}}, pu)
	a = (3*fy + pu/0.9) / (0.85 * fc * 14)
	require.InDelta(t, 0.9, s.phi, 1e-12)
	require.InEpsilon(t, 0.85*fc*14*a*(12-a/2)+3*fy*(21.5-12), s.mn, 1e-9)
	s = f.strength([]steelAt{{21.5, 3, fy}}, -pu)
	a = (3*fy - pu/0.9) / (0.85 * fc * 14)
	require.InEpsilon(t, 0.85*fc*14*a*(12-a/2)+3*fy*(21.5-12), s.mn, 1e-9)
	require.False(t, f.strength([]steelAt{{21.5, 3, fy}}, -200000).ok)
}

// twistedJudge is a judge of torsion for a section, in inches and psi.
func twistedJudge(s beam.Section, fc float64) *judge {
	p := inch
	j := &judge{printed: &p, b: &beam.Brief{Section: s}, fc: fc, fy: 60000, fyt: 60000, lambda: 1}
	j.s = p.shapeOf(j.b)
	j.bw, j.h = j.s.strip, j.s.h
	j.twist = j.twisting()
	return j
}

// TestThresholds holds 22.7.4.1 and 22.7.5.1 against their own arithmetic.
func TestThresholds(t *testing.T) {
	j := twistedJudge(beam.Section{Shape: beam.Rectangular, Width: inches(12), Depth: inches(20)}, 4900)
	require.InEpsilon(t, 70*240*240/64.0, j.threshold(0), 1e-12)
	require.InEpsilon(t, 4*70*240*240/64.0, j.cracking22(0), 1e-12)
	// Nu of 4Ag√f'c doubles the radicand; as much tension leaves nothing.
	require.InEpsilon(t, math.Sqrt2, j.threshold(4*240*70)/j.threshold(0), 1e-12)
	require.Zero(t, j.cracking22(-4*240*70))

	// A flange counts over four thicknesses a side: 12 + 2*16.
	j = twistedJudge(beam.Section{Shape: beam.Tee, Width: inches(12), Depth: inches(28), FlangeThickness: inches(4), FlangeWidth: inches(60)}, 4900)
	acp, pcp := 12.0*28+32*4, 2*(28+44.0)
	require.InEpsilon(t, 70*acp*acp/pcp, j.threshold(0), 1e-12)
	// A flange that is wide and thin makes Acp2/pcp less, and is left out.
	j = twistedJudge(beam.Section{Shape: beam.Tee, Width: inches(24), Depth: inches(28), FlangeThickness: inches(2), FlangeWidth: inches(60)}, 4900)
	require.InEpsilon(t, 70*672.0*672/104, j.threshold(0), 1e-12)
	require.False(t, j.twist.flange)

	// A box: Ag for Acp in the threshold alone.
	j = twistedJudge(beam.Section{Shape: beam.Polygon, Outline: corners(0, 0, 30, 0, 30, 40, 0, 40), Voids: [][]beam.Point{corners(6, 6, 24, 6, 24, 34, 6, 34)}}, 4900)
	ag := 1200.0 - 18*28
	require.True(t, j.twist.hollow)
	require.InEpsilon(t, 70*ag*ag/140, j.threshold(0), 1e-12)
	require.InEpsilon(t, 4*70*1200*1200/140.0, j.cracking22(0), 1e-12)
}

// TestDesignTorque sheds what compatibility imposes, down to the cracking
// torque, and nothing that equilibrium needs (22.7.3).
func TestDesignTorque(t *testing.T) {
	j := twistedJudge(beam.Section{Shape: beam.Rectangular, Width: inches(12), Depth: inches(20)}, 4900)
	cracking := 0.75 * j.cracking22(0)
	for _, c := range []struct {
		name           string
		all, shed, use float64
	}{
		{"below the threshold", 0.24, 0, 0},
		{"equilibrium", 3, 0, 3},
		{"compatibility below cracking", 0.9, 0.9, 0.9},
		{"compatibility", 3, 3, 1},
		{"compatibility the other way round", -3, -3, 1},
		{"mostly compatibility", 3, 2.5, 1},
		{"mostly equilibrium", 3, 1, 2},
		{"compatibility helps", 2, -1, 3},
	} {
		t.Run(c.name, func(t *testing.T) {
			require.InDelta(t, c.use*cracking, j.designTorque(c.all*cracking, c.shed*cracking, 0), 1e-6*cracking)
		})
	}
}
