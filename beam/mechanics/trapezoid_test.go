package mechanics_test

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// The centroid and the second moment of a trapezoid, from any handbook.
func TestGrossTrapezoid(t *testing.T) {
	for _, w := range []struct{ a, b float64 }{{300, 500}, {500, 300}, {400, 10}} {
		const h = 600.0
		p, err := mechanics.Section{Parts: mechanics.Trapezoid(mm(w.a), mm(w.b), mm(h))}.Gross()
		require.NoError(t, err)
		require.InEpsilon(t, (w.a+w.b)/2*h, p.Area.In(units.SquareMillimetre), exact)
		require.InEpsilon(t, h/3*(w.a+2*w.b)/(w.a+w.b), p.Centroid.In(units.Millimetre), exact)
		require.InEpsilon(t, h/3*(2*w.a+w.b)/(w.a+w.b), p.ToBottom.In(units.Millimetre), exact)
		require.InEpsilon(t, h*h*h/36*(w.a*w.a+4*w.a*w.b+w.b*w.b)/(w.a+w.b), p.SecondMoment.In(units.Millimetre4), exact)
	}
}

// A box is the outer rectangle less the hollow.
func TestGrossBox(t *testing.T) {
	const b, h, top, bottom, webs = 1200.0, 900.0, 150.0, 200.0, 400.0
	parts := mechanics.Box(mm(b), mm(h), mm(top), mm(bottom), mm(webs))
	p, err := mechanics.Section{Parts: parts}.Gross()
	require.NoError(t, err)
	hollow, tall := b-webs, h-top-bottom
	area := b*h - hollow*tall
	y := (b*h*h/2 - hollow*tall*(top+tall/2)) / area
	second := b*h*h*h/12 + b*h*(y-h/2)*(y-h/2) - hollow*tall*tall*tall/12 - hollow*tall*(y-top-tall/2)*(y-top-tall/2)
	require.InEpsilon(t, area, p.Area.In(units.SquareMillimetre), exact)
	require.InEpsilon(t, y, p.Centroid.In(units.Millimetre), exact)
	require.InEpsilon(t, second, p.SecondMoment.In(units.Millimetre4), exact)
}

func TestWidthsOfAPart(t *testing.T) {
	top, bottom := mechanics.Part{Width: mm(300)}.Widths()
	require.Equal(t, [2]units.Length{mm(300), mm(300)}, [2]units.Length{top, bottom})
	top, bottom = mechanics.Part{Width: mm(300), BottomWidth: mm(200)}.Widths()
	require.Equal(t, [2]units.Length{mm(300), mm(200)}, [2]units.Length{top, bottom})
}

// The block of a trapezoid as deep as a holds width·a + slope·a²/2, of which the
// depth is the root of a quadratic; the moment follows by the two pieces.
func TestUltimateTrapezoidIsExact(t *testing.T) {
	const a, b, h, d, area = 300.0, 500.0, 700.0, 630.0, 2400.0
	law := whitney(t, mpa(30), 0.85)
	widening := mechanics.Section{Parts: mechanics.Trapezoid(mm(a), mm(b), mm(h)), Layers: []mechanics.Layer{layerSI(d, area, 420)}}
	narrowing := mechanics.Section{Parts: mechanics.Trapezoid(mm(b), mm(a), mm(h)), Layers: []mechanics.Layer{layerSI(d, area, 420)}}
	hung := mechanics.Section{Parts: mechanics.Trapezoid(mm(b), mm(a), mm(h)), Layers: []mechanics.Layer{layerSI(h-d, area, 420)}}
	for _, test := range []struct {
		section      mechanics.Section
		sense        mechanics.Sense
		width, slope float64
	}{
		{widening, mechanics.Sagging, a, (b - a) / h},
		{narrowing, mechanics.Sagging, b, (a - b) / h},
		{hung, mechanics.Hogging, a, (b - a) / h},
	} {
		u := solve(t, test.section, law, mechanics.Bending{Sense: test.sense})
		block := 420 * area / 25.5 // area under stress
		depth := 2 * block / (test.width + math.Sqrt(test.width*test.width+2*test.slope*block))
		first := test.width*depth*depth/2 + test.slope*depth*depth*depth/3
		require.InEpsilon(t, depth, u.CompressionDepth.In(units.Millimetre), exact)
		require.InEpsilon(t, 420*area, u.Concrete.In(units.Newton), exact)
		require.InEpsilon(t, first/block, u.ConcreteDepth.In(units.Millimetre), exact)
		require.InEpsilon(t, 420*area*(d-first/block), u.Nominal.In(units.NewtonMillimetre), exact)
		require.Equal(t, 1, u.Equilibria)
	}
}

// Below a flange that tapers to the web.
func TestUltimateHaunchedTeeIsExact(t *testing.T) {
	law := whitney(t, mpa(30), 0.8)
	// Flange 800 x 80, haunch to 300 over 60, web 300; block 240 deep.
	const haunch, upper, lower = 550.0 * 60, 800.0 * 80, 300.0 * 100
	const force = 25.5 * (upper + haunch + lower)
	// The haunch's centroid is 60/3·(800+2·300)/(800+300) below its top.
	const first = 25.5 * (upper*40 + haunch*(80+20.0*1400/1100) + lower*190)
	s := mechanics.Section{
		Parts: []mechanics.Part{
			{Bottom: mm(80), Width: mm(800)},
			{Top: mm(80), Bottom: mm(140), Width: mm(800), BottomWidth: mm(300)},
			{Top: mm(140), Bottom: mm(900), Width: mm(300)},
		},
		Layers: []mechanics.Layer{layerSI(820, force/420, 420)},
	}
	u := solve(t, s, law, mechanics.Bending{})
	require.InEpsilon(t, 240, u.CompressionDepth.In(units.Millimetre), exact)
	require.InEpsilon(t, 300, u.NeutralAxis.In(units.Millimetre), exact)
	require.InEpsilon(t, force*820-first, u.Nominal.In(units.NewtonMillimetre), exact)
}

// An axial force at the limit of a trapezoid stresses all of it: the plain sum
// of concrete and steel, about the centroid.
func TestAxialLimitOfATrapezoid(t *testing.T) {
	s := mechanics.Section{Parts: mechanics.Trapezoid(mm(300), mm(500), mm(600)), Layers: []mechanics.Layer{layerSI(300, 1000, 420)}}
	squash := 25.5*(240e3-1000) + 420*1000
	var none *mechanics.NoEquilibriumError
	_, err := s.Ultimate(whitney(t, mpa(30), 0.85), mechanics.Bending{Axial: units.Newton.Of(squash * 1.000001)})
	require.ErrorAs(t, err, &none)
	require.InEpsilon(t, squash, none.Most.In(units.Newton), exact)
	require.InEpsilon(t, -420e3, none.Least.In(units.Newton), exact)
	u := solve(t, s, whitney(t, mpa(30), 0.85), mechanics.Bending{Axial: units.Newton.Of(squash * 0.999999)})
	require.InEpsilon(t, 240e3*25.5, u.Concrete.In(units.Newton), exact)
	require.InEpsilon(t, 200*(300+1000.0)/800, u.ConcreteDepth.In(units.Millimetre), exact)
}

// The first moment of a cracked trapezoid about its neutral axis is a cubic:
// w·x²/2 + slope·x³/6 = n·As·(d - x), solved here by halving.
func TestCrackedTrapezoid(t *testing.T) {
	const h, d, area, n = 650.0, 590.0, 2500.0, 8.0
	for _, w := range []struct{ top, bottom float64 }{{200, 500}, {600, 150}, {300, 0.2}} {
		slope := (w.bottom - w.top) / h
		balance := func(x float64) float64 { return w.top*x*x/2 + slope*x*x*x/6 - n*area*(d-x) }
		lo, hi := 0.0, d
		for range 100 {
			if mid := (lo + hi) / 2; balance(mid) < 0 {
				lo = mid
			} else {
				hi = mid
			}
		}
		second := w.top*lo*lo*lo/3 + slope*lo*lo*lo*lo/12 + n*area*(d-lo)*(d-lo)
		up := mechanics.Section{Parts: mechanics.Trapezoid(mm(w.top), mm(w.bottom), mm(h)), Layers: []mechanics.Layer{layerSI(d, area, 420)}}
		down := mechanics.Section{Parts: mechanics.Trapezoid(mm(w.bottom), mm(w.top), mm(h)), Layers: []mechanics.Layer{layerSI(h-d, area, 420)}}
		for sense, s := range []mechanics.Section{up, down} {
			c, err := s.Cracked(n, mechanics.Sense(sense))
			require.NoError(t, err)
			require.InEpsilon(t, lo, c.NeutralAxis.In(units.Millimetre), exact)
			require.InEpsilon(t, second, c.SecondMoment.In(units.Millimetre4), exact)
		}
	}
}

// Where the neutral axis is below a flange and a haunch, against the same
// section in rectangles, five hundred a part.
func TestCrackedHaunchedTee(t *testing.T) {
	const n, cuts = 9.0, 500
	layers := []mechanics.Layer{layerSI(820, 9000, 420), layerSI(60, 800, 420)}
	haunched := mechanics.Section{Layers: layers, Parts: []mechanics.Part{
		{Bottom: mm(80), Width: mm(700)},
		{Top: mm(80), Bottom: mm(160), Width: mm(700), BottomWidth: mm(300)},
		{Top: mm(160), Bottom: mm(900), Width: mm(300), BottomWidth: mm(200)},
	}}
	var steps mechanics.Section
	steps.Layers = layers
	for _, p := range haunched.Parts {
		above, below := p.Widths()
		for i := range cuts {
			mid := (float64(i) + 0.5) / cuts
			steps.Parts = append(steps.Parts, mechanics.Part{
				Top:    p.Top.Add(p.Bottom.Sub(p.Top).Scale(float64(i) / cuts)),
				Bottom: p.Top.Add(p.Bottom.Sub(p.Top).Scale(float64(i+1) / cuts)),
				Width:  above.Scale(1 - mid).Add(below.Scale(mid)),
			})
		}
	}
	a, err := haunched.Cracked(n, mechanics.Sagging)
	require.NoError(t, err)
	b, err := steps.Cracked(n, mechanics.Sagging)
	require.NoError(t, err)
	require.Greater(t, a.NeutralAxis.In(units.Millimetre), 160.0)
	require.InEpsilon(t, b.NeutralAxis.In(units.Metre), a.NeutralAxis.In(units.Metre), 1e-6)
	require.InEpsilon(t, b.SecondMoment.In(units.Metre4), a.SecondMoment.In(units.Metre4), 1e-6)
}
