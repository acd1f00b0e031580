package mechanics_test

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// exact is the agreement asked of closed forms.
const exact = 1e-12

// The formulas of these tests are those of any textbook of reinforced concrete
// for the rectangular block; they are written out here in kips and inches and
// share nothing with the package.

func TestSinglyReinforcedYieldingIsExact(t *testing.T) {
	law := whitney(t, ksi(4), 0.85)
	for _, width := range []float64{8, 11, 14.5, 30} {
		for _, d := range []float64{9, 17.5, 33.3} {
			for _, rho := range []float64{0.0011, 0.004, 0.0125, 0.018} {
				area := rho * width * d
				s := mechanics.Section{Parts: mechanics.Rectangle(in(width), in(d+2.5)), Layers: []mechanics.Layer{layerUS(d, area, 60)}}
				u := solve(t, s, law, mechanics.Bending{})
				a := area * 60 / (3.4 * width)
				require.InEpsilon(t, a, u.CompressionDepth.In(units.Inch), exact)
				require.InEpsilon(t, a/0.85, u.NeutralAxis.In(units.Inch), exact)
				require.InEpsilon(t, area*60*(d-a/2), u.Nominal.In(units.KipInch), exact)
				require.InEpsilon(t, 0.003*(d-a/0.85)/(a/0.85), u.ExtremeStrain, exact)
				require.InEpsilon(t, area*60, u.Concrete.In(units.Kip), exact)
				require.InEpsilon(t, a/2, u.ConcreteDepth.In(units.Inch), exact)
				require.InEpsilon(t, 0.003*0.85/a, u.Curvature.In(units.PerInch), exact)
				require.Equal(t, 1, u.Equilibria)
			}
		}
	}
}

func TestSinglyReinforcedNotYieldingIsExact(t *testing.T) {
	// 3.4·b·0.85·c² + As·Es·0.003·c - As·Es·0.003·d = 0
	const width, d, area = 12.0, 20.0, 9.0
	s := mechanics.Section{Parts: mechanics.Rectangle(in(width), in(23)), Layers: []mechanics.Layer{layerUS(d, area, 60)}}
	u := solve(t, s, whitney(t, ksi(4), 0.85), mechanics.Bending{})
	q, e := 3.4*width*0.85, area*87
	c := (-e + math.Sqrt(e*e+4*q*e*d)) / (2 * q)
	require.Less(t, 87*(d-c)/c, 60.0)
	require.InEpsilon(t, c, u.NeutralAxis.In(units.Inch), exact)
	require.InEpsilon(t, 87*(c-d)/c, u.Layers[0].Stress.In(units.KSI), exact)
	require.InEpsilon(t, q*c*(d-0.425*c), u.Nominal.In(units.KipInch), exact)
}

func TestDoublyReinforcedIsExact(t *testing.T) {
	const width, height, d = 14.0, 24.0, 21.5
	law := whitney(t, ksi(4), 0.85)
	q := 3.4 * width * 0.85 // kip an inch of neutral-axis depth
	tests := []struct {
		name         string
		dTop, aTop   float64
		area         float64
		displaced    mechanics.Displaced
		yields       bool
		insideBlock  bool
		topInTension bool
	}{
		{name: "compression steel yields", dTop: 2, aTop: 1.2, area: 6.5, yields: true, insideBlock: true},
		{name: "compression steel below yield", dTop: 2.5, aTop: 1.2, area: 4, insideBlock: true},
		{name: "compression steel below yield, concrete ignored", dTop: 2.5, aTop: 1.2, area: 4, displaced: mechanics.Ignore},
		{name: "compression steel yields, concrete ignored", dTop: 2, aTop: 1.2, area: 6.5, displaced: mechanics.Ignore, yields: true},
		{name: "bar between block and neutral axis", dTop: 2.5, aTop: 1, area: 1.75},
		{name: "top bar in tension", dTop: 5, aTop: 0.4, area: 2, topInTension: true},
	}
	for _, test := range tests {
		t.Run(test.name, func(t *testing.T) {
			deducted := 0.0
			if test.insideBlock {
				deducted = 3.4
			}
			var c float64
			if test.yields {
				c = (60*test.area - test.aTop*(60-deducted)) / q
			} else {
				// q·c² + [A's(87 - deducted) - As·fy]c - A's·87·d' = 0
				p, r := test.aTop*(87-deducted)-60*test.area, test.aTop*87*test.dTop
				c = (-p + math.Sqrt(p*p+4*q*r)) / (2 * q)
			}
			stress := 87 * (c - test.dTop) / c
			require.Equal(t, test.yields, stress >= 60, "the case is what it says")
			require.Equal(t, test.insideBlock || test.displaced == mechanics.Ignore, test.dTop < 0.85*c, "the case is what it says")
			require.Equal(t, test.topInTension, stress < 0, "the case is what it says")
			stress = math.Min(60, stress)
			moment := q*c*(d-0.425*c) + test.aTop*(stress-deducted)*(d-test.dTop)

			s := mechanics.Section{
				Parts:  mechanics.Rectangle(in(width), in(height)),
				Layers: []mechanics.Layer{layerUS(d, test.area, 60), layerUS(test.dTop, test.aTop, 60)},
			}
			u := solve(t, s, law, mechanics.Bending{Displaced: test.displaced})
			require.InEpsilon(t, c, u.NeutralAxis.In(units.Inch), exact)
			require.InEpsilon(t, moment, u.Nominal.In(units.KipInch), exact)
			require.InEpsilon(t, stress, u.Layers[1].Stress.In(units.KSI), 1e-11)
			require.InDelta(t, deducted, u.Layers[1].Displaced.In(units.KSI), 1e-12)
			require.InEpsilon(t, test.aTop*(stress-deducted), u.Layers[1].Force.In(units.Kip), 1e-11)
		})
	}
}

func TestFlangedSectionIsExact(t *testing.T) {
	// The overhangs' force is a constant; the web takes the rest.
	const bf, hf, bw, d, area = 30.0, 4.0, 12.0, 25.0, 9.36
	s := mechanics.Section{
		Parts:  mechanics.Tee(in(bf), in(hf), in(bw), in(28)),
		Layers: []mechanics.Layer{layerUS(d, area, 60)},
	}
	u := solve(t, s, whitney(t, ksi(3), 0.85), mechanics.Bending{})
	flange := 2.55 * (bf - bw) * hf
	a := (60*area - flange) / (2.55 * bw)
	require.Greater(t, a, hf)
	require.InEpsilon(t, a, u.CompressionDepth.In(units.Inch), exact)
	require.InEpsilon(t, flange*(d-hf/2)+(60*area-flange)*(d-a/2), u.Nominal.In(units.KipInch), exact)
}

func TestAxialForceIsExact(t *testing.T) {
	// Steel yields at both faces: the axial force adds to the block alone, and
	// the moment is about mid-depth.
	const width, height, d, dTop, area, axial = 16.0, 24.0, 21.5, 2.5, 3.0, 260.0
	s := mechanics.Section{
		Parts:  mechanics.Rectangle(in(width), in(height)),
		Layers: []mechanics.Layer{layerUS(dTop, area, 40), layerUS(d, area, 40)},
	}
	u := solve(t, s, whitney(t, ksi(4), 0.85), mechanics.Bending{Axial: units.Kip.Of(axial)})
	a := (axial + area*3.4) / (3.4 * width)
	c := a / 0.85
	require.Greater(t, 87*(c-dTop)/c, 40.0, "the case is what it says")
	moment := 3.4*width*a*(height/2-a/2) + area*(40-3.4)*(height/2-dTop) + area*40*(d-height/2)
	require.InEpsilon(t, c, u.NeutralAxis.In(units.Inch), exact)
	require.InEpsilon(t, moment, u.Nominal.In(units.KipInch), exact)
}

// The resultant of the parabola and rectangle of EN 1992-1-1:2004 3.1.7(1) with
// strains 0.002 and 0.0035 is 17/21 of the strength times the depth, 0.8095, at
// 0.416 of the depth: integrated by hand, and the figures that handbooks print.
func TestParabolaRectangleIsExact(t *testing.T) {
	law, err := mechanics.ParabolaRectangle(mpa(20), 0.002, 0.0035, 2)
	require.NoError(t, err)
	const alpha, lever = 17.0 / 21, 99.0 / 238
	mean, depth := law.Resultant()
	require.InEpsilon(t, alpha*20, mean.In(units.Megapascal), exact)
	require.InEpsilon(t, lever, depth, exact)
	require.InDelta(t, 0.8095, alpha, 5e-5)
	require.InDelta(t, 0.416, lever, 5e-4)

	const width, d, area, yield = 300.0, 500.0, 1570.0, 435.0
	s := mechanics.Section{Parts: mechanics.Rectangle(mm(width), mm(550)), Layers: []mechanics.Layer{layerSI(d, area, yield)}}
	u := solve(t, s, law, mechanics.Bending{})
	c := area * yield / (alpha * 20 * width)
	require.InEpsilon(t, c, u.NeutralAxis.In(units.Millimetre), exact)
	require.InEpsilon(t, c, u.CompressionDepth.In(units.Millimetre), exact)
	require.InEpsilon(t, lever*c, u.ConcreteDepth.In(units.Millimetre), exact)
	require.InEpsilon(t, area*yield*(d-lever*c), u.Nominal.In(units.NewtonMillimetre), exact)
}

// Bilinear, EN 1992-1-1:2004 3.1.7(2) with strains 0.00175 and 0.0035: half of it
// a triangle, so 3/4 of the strength at 7/18 of the depth.
func TestBilinearIsExact(t *testing.T) {
	law, err := mechanics.Bilinear(mpa(20), 0.00175, 0.0035)
	require.NoError(t, err)
	mean, depth := law.Resultant()
	require.InEpsilon(t, 15, mean.In(units.Megapascal), exact)
	require.InEpsilon(t, 7.0/18, depth, exact)

	line, err := mechanics.Polyline(mechanics.Point{}, mechanics.Point{Strain: 0.00175, Stress: mpa(20)}, mechanics.Point{Strain: 0.0035, Stress: mpa(20)})
	require.NoError(t, err)
	s := mechanics.Section{
		Parts:  mechanics.Tee(mm(600), mm(100), mm(250), mm(600)),
		Layers: []mechanics.Layer{layerSI(540, 4000, 435), layerSI(60, 800, 435)},
	}
	a, b := solve(t, s, law, mechanics.Bending{}), solve(t, s, line, mechanics.Bending{})
	require.InEpsilon(t, a.Nominal.In(units.NewtonMetre), b.Nominal.In(units.NewtonMetre), exact)
}

// With the whole section beyond the peak strain the concrete is a constant, and
// with both steels yielding the limit of axial force is the plain sum.
func TestAxialLimits(t *testing.T) {
	law := whitney(t, ksi(4), 0.85)
	s := mechanics.Section{
		Parts:  mechanics.Rectangle(in(12), in(20)),
		Layers: []mechanics.Layer{layerUS(2.5, 2, 60), layerUS(17.5, 2, 60)},
	}
	squash := 3.4*(240-4) + 4*60.0
	_, err := s.Ultimate(law, mechanics.Bending{Axial: units.Kip.Of(squash * 1.0001)})
	var none *mechanics.NoEquilibriumError
	require.ErrorAs(t, err, &none)
	require.InEpsilon(t, squash, none.Most.In(units.Kip), exact)
	require.InEpsilon(t, -240.0, none.Least.In(units.Kip), exact)
	_, err = s.Ultimate(law, mechanics.Bending{Axial: units.Kip.Of(squash * 0.9999)})
	require.NoError(t, err)
	_, err = s.Ultimate(law, mechanics.Bending{Axial: units.Kip.Of(-240.001)})
	require.ErrorAs(t, err, &none)
	u := solve(t, s, law, mechanics.Bending{Axial: units.Kip.Of(-239)})
	require.InEpsilon(t, 1.0/(3.4*12*0.85), u.NeutralAxis.In(units.Inch), 1e-10)
}
