package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// Every row and cap of 22.5.5 to 22.5.7 in every edition, on both sides of the
// line that divides it from its neighbour. The sections are 14 by 20 in., d = 17
// in. (350 by 500 mm, d = 425 mm) with Ag = 300 in2 (190,000 mm2), which is not
// bw h, √f'c = 70 psi (5 MPa). Own calculations from the clauses.
func TestEveryRowInEveryEdition(t *testing.T) {
	us := shearCase{fc: 4900, lambda: 1, bw: 14, h: 20, d: 17, as: 2.38, fyt: 60000, ag: 300} // ρw = 1 %
	si := shearCase{fc: 25, lambda: 1, bw: 350, h: 500, d: 425, as: 1487.5, fyt: 420, ag: 190000}
	usTied, siTied := us, si
	usTied.av, usTied.s = 0.4, 8 // 0.05 > 0.0123
	siTied.av, siTied.s = 258, 200
	const bd, bdSI = 14.0 * 17, 350.0 * 425
	with := func(c shearCase, f func(*shearCase)) shearCase { f(&c); return c }
	rho := func(r float64) func(*shearCase) { return func(c *shearCase) { c.as = r * c.bw * c.d } }
	axial := func(n float64) func(*shearCase) { return func(c *shearCase) { c.nu = n } }
	light := func(c *shearCase) { c.lambda = 0.85 }
	detailed := func(v, m, r float64) func(*shearCase) {
		return func(c *shearCase) {
			c.method, c.vu, c.mu, c.as = beam.DetailedShear, v, m, r*c.bw*c.d
		}
	}
	both := func(fs ...func(*shearCase)) func(*shearCase) {
		return func(c *shearCase) {
			for _, f := range fs {
				f(c)
			}
		}
	}
	for _, k := range []struct {
		name string
		e    *edition
		c    shearCase
		row  concreteRow
		vc   float64
	}{
		{"simplified", &us14, us, rowSimplified, 2 * 70 * bd},
		{"simplified", &si14, si, rowSimplified, 0.17 * 5 * bdSI},
		{"simplified, light", &us14, with(us, light), rowSimplified, 2 * 0.85 * 70 * bd},
		{"simplified, light", &si14, with(si, light), rowSimplified, 0.17 * 0.85 * 5 * bdSI},

		// Vu d/Mu just below and at 1: 20,000 × 17 = 340,000; 80,000 × 425 = 34e6.
		{"detailed a", &us14, with(us, detailed(20000, 680000, 0.01)), rowDetailedA, (1.9*70 + 2500*0.01*0.5) * bd},
		{"detailed b, Vu d = Mu", &us14, with(us, detailed(20000, 340000, 0.01)), rowDetailedB, (1.9*70 + 2500*0.01) * bd},
		{"detailed a", &si14, with(si, detailed(80000, 68e6, 0.01)), rowDetailedA, (0.16*5 + 17*0.01*0.5) * bdSI},
		{"detailed b, Vu d = Mu", &si14, with(si, detailed(80000, 34e6, 0.01)), rowDetailedB, (0.16*5 + 17*0.01) * bdSI},
		{"detailed a, light", &us14, with(us, both(detailed(20000, 680000, 0.01), light)), rowDetailedA, (1.9*0.85*70 + 2500*0.01*0.5) * bd},
		// Row (c) is the least from ρw = 1.6 × 70/2500 = 4.48 %; SI 0.13 × 5/17 = 3.8235 %.
		{"detailed b below row c", &us14, with(us, detailed(20000, 0, 0.0447)), rowDetailedB, (1.9*70 + 2500*0.0447) * bd},
		{"detailed c", &us14, with(us, detailed(20000, 0, 0.0449)), rowDetailedC, 3.5 * 70 * bd},
		{"detailed b below row c", &si14, with(si, detailed(80000, 0, 0.0382)), rowDetailedB, (0.16*5 + 17*0.0382) * bdSI},
		{"detailed c", &si14, with(si, detailed(80000, 0, 0.0383)), rowDetailedC, 0.29 * 5 * bdSI},
		{"detailed c, light", &us14, with(us, both(detailed(20000, 0, 0.0449), light)), rowDetailedC, 3.5 * 0.85 * 70 * bd},
		{"detailed a below row c", &us14, with(us, detailed(20000, 680000, 0.05)), rowDetailedA, (1.9*70 + 2500*0.05*0.5) * bd},

		{"compression", &us14, with(us, axial(60000)), rowCompression, 2 * (1 + 60000.0/(2000*300)) * 70 * bd},
		{"compression", &si14, with(si, axial(266000)), rowCompression, 0.17 * (1 + 266000.0/(14*190000)) * 5 * bdSI},
		{"tension", &us14, with(us, axial(-60000)), rowTension, 2 * (1 - 60000.0/(500*300)) * 70 * bd},
		{"tension", &si14, with(si, axial(-266000)), rowTension, 0.17 * (1 - 266000.0/(3.5*190000)) * 5 * bdSI},
		{"tension, a little left", &us14, with(us, axial(-149000)), rowTension, 2 * (1 - 149000.0/(500*300)) * 70 * bd},
		{"tension, none left", &us14, with(us, axial(-151000)), rowNone, 0},
		{"tension, a little left", &si14, with(si, axial(-664000)), rowTension, 0.17 * (1 - 664000.0/(3.5*190000)) * 5 * bdSI},
		{"tension, none left", &si14, with(si, axial(-666000)), rowNone, 0},

		// Rows (a) and (b) meet at ρw = 1.5625 % in US units, (0.17/0.66)³ = 1.7089 % in SI.
		{"row a", &us19, with(usTied, rho(0.0156)), rowA, 2 * 70 * bd},
		{"row b", &us19, with(usTied, rho(0.0157)), rowB, 8 * math.Cbrt(0.0157) * 70 * bd},
		{"row a", &si19, with(siTied, rho(0.01708)), rowA, 0.17 * 5 * bdSI},
		{"row b", &si19, with(siTied, rho(0.01710)), rowB, 0.66 * math.Cbrt(0.01710) * 5 * bdSI},
		{"row a, light", &us19, with(usTied, light), rowA, 2 * 0.85 * 70 * bd},
		{"row c", &us19, us, rowC, 8 * math.Sqrt(2/2.7) * math.Cbrt(0.01) * 70 * bd},
		{"row c", &si19, si, rowC, 0.66 * math.Sqrt(2/2.7) * math.Cbrt(0.01) * 5 * bdSI},
		{"row c, light", &si19, with(si, light), rowC, 0.66 * math.Sqrt(2/2.7) * 0.85 * math.Cbrt(0.01) * 5 * bdSI},
		// λs leaves 1 at d = 10 in. and 250 mm.
		{"row c, d = 10 in", &us19, with(us, func(c *shearCase) { c.d, c.as = 10, 1.4 }), rowC, 8 * math.Cbrt(0.01) * 70 * 140},
		{"row c, d = 10.1 in", &us19, with(us, func(c *shearCase) { c.d, c.as = 10.1, 1.414 }), rowC, 8 * math.Sqrt(2/2.01) * math.Cbrt(0.01) * 70 * 141.4},
		{"row c, d = 250 mm", &si19, with(si, func(c *shearCase) { c.d, c.as = 250, 875 }), rowC, 0.66 * math.Cbrt(0.01) * 5 * 87500},
		{"row c, d = 252 mm", &si19, with(si, func(c *shearCase) { c.d, c.as = 252, 882 }), rowC, 0.66 * math.Sqrt(2/(1+0.004*252)) * math.Cbrt(0.01) * 5 * 88200},
		// Least stirrups: max(0.75 × 70, 50) × 14/60,000 = 0.01225; max(0.062 × 5, 0.35) × 350/420 = 0.29167.
		{"least stirrups", &us19, with(us, func(c *shearCase) { c.av, c.s = 0.01225*8, 8 }), rowA, 2 * 70 * bd},
		{"short of them", &us19, with(us, func(c *shearCase) { c.av, c.s = 0.01224*8, 8 }), rowC, 8 * math.Sqrt(2/2.7) * math.Cbrt(0.01) * 70 * bd},
		{"least stirrups", &si19, with(si, func(c *shearCase) { c.av, c.s = 0.35*350/420*200, 200 }), rowA, 0.17 * 5 * bdSI},
		{"short of them", &si19, with(si, func(c *shearCase) { c.av, c.s = 0.3499*350/420*200, 200 }), rowC, 0.66 * math.Sqrt(2/2.7) * math.Cbrt(0.01) * 5 * bdSI},

		{"row a, compression", &us19, with(usTied, axial(60000)), rowA, (2*70 + 60000.0/1800) * bd},
		{"row a, compression", &si19, with(siTied, axial(266000)), rowA, (0.17*5 + 266000.0/(6*190000)) * bdSI},
		{"row b, compression", &us19, with(usTied, both(axial(60000), rho(0.0157))), rowB, (8*math.Cbrt(0.0157)*70 + 60000.0/1800) * bd},
		{"row c, compression", &si19, with(si, axial(266000)), rowC, (0.66*math.Sqrt(2/2.7)*math.Cbrt(0.01)*5 + 266000.0/(6*190000)) * bdSI},
		{"row c, tension", &us19, with(us, axial(-60000)), rowC, (8*math.Sqrt(2/2.7)*math.Cbrt(0.01)*70 - 60000.0/1800) * bd},
		// Nu/(6 Ag) meets 0.05 f'c at 0.3 f'c Ag: 245 psi × 1800 = 441,000 lb; 1.25 × 1,140,000 = 1,425,000 N.
		{"the cap takes in the axial term", &us19, with(usTied, axial(440000)), rowMost, 5 * 70 * bd},
		{"axial term, light steel", &us19, with(us, both(axial(440000), rho(0.0001))), rowC, (8*math.Sqrt(2/2.7)*math.Cbrt(0.0001)*70 + 440000.0/1800) * bd},
		{"axial term capped", &us19, with(us, both(axial(500000), rho(0.0001))), rowC, (8*math.Sqrt(2/2.7)*math.Cbrt(0.0001)*70 + 245) * bd},
		{"axial term, light steel", &si19, with(si, both(axial(1400000), rho(0.0001))), rowC, (0.66*math.Sqrt(2/2.7)*math.Cbrt(0.0001)*5 + 1400000.0/1140000) * bdSI},
		{"axial term capped", &si19, with(si, both(axial(1500000), rho(0.0001))), rowC, (0.66*math.Sqrt(2/2.7)*math.Cbrt(0.0001)*5 + 1.25) * bdSI},
		// 5 λ√f'c: row (b) reaches it at ρw = (5/8)³ = 24.41 %, SI (0.42/0.66)³ = 25.77 %.
		{"below the cap", &us19, with(usTied, rho(0.244)), rowB, 8 * math.Cbrt(0.244) * 70 * bd},
		{"cap", &us19, with(usTied, rho(0.245)), rowMost, 5 * 70 * bd},
		{"below the cap", &si19, with(siTied, rho(0.257)), rowB, 0.66 * math.Cbrt(0.257) * 5 * bdSI},
		{"cap", &si19, with(siTied, rho(0.258)), rowMost, 0.42 * 5 * bdSI},
		// Tension leaves nothing: row (a), 140 psi × 1800 = 252,000 lb; 0.85 MPa × 1,140,000 = 969,000 N.
		{"a little left", &us19, with(usTied, axial(-251000)), rowA, (140 - 251000.0/1800) * bd},
		{"none left", &us19, with(usTied, axial(-253000)), rowNone, 0},
		{"a little left", &si19, with(siTied, axial(-968000)), rowA, (0.85 - 968000.0/1140000) * bdSI},
		{"none left", &si19, with(siTied, axial(-970000)), rowNone, 0},
	} {
		t.Run(k.e.id+" "+k.name, func(t *testing.T) {
			w, s := k.c.evaluate(k.e)
			require.Equal(t, k.row.String(), s.concrete.row.String())
			require.InDelta(t, k.vc, s.concrete.strength, 1e-9*(1+k.vc))
			require.Equal(t, s.concrete.strength, s.concrete.ordinary)
			// The section limit rests on the same Vc, without λ in its 8√f'c.
			section := 8 * 70 * bd
			if k.e.system == units.SI {
				section = 0.66 * 5 * bdSI
			}
			if k.c.d == 17 || k.c.d == 425 {
				require.InEpsilon(t, 0.75*(k.vc+section), s.limit, 1e-9)
			}
			for _, steps := range [][]beam.Step{w.strengthSteps(k.e, &s, nil), w.limitSteps(k.e, &s), w.leastSteps(k.e, &s)} {
				requireEvaluable(t, &beam.Check{ID: k.name, Steps: steps})
			}
		})
	}
}

// √f'c counts with at most 100 psi (8.3 MPa) in Vc without least stirrups, from
// both sides: 9990 and 10,010 psi; 68.8 and 69 MPa against 8.3² = 68.89 MPa.
func TestCapOnRootFromBothSides(t *testing.T) {
	for _, k := range []struct {
		e      *edition
		fc     float64
		root   float64
		capped bool
	}{
		{&us14, 9990, math.Sqrt(9990), false},
		{&us14, 10010, 100, true},
		{&us19, 9990, math.Sqrt(9990), false},
		{&us19, 10010, 100, true},
		{&si14, 68.8, math.Sqrt(68.8), false},
		{&si14, 69, 8.3, true},
		{&si19, 68.8, math.Sqrt(68.8), false},
		{&si19, 69, 8.3, true},
	} {
		s := shearMids[k.e]
		s.fc = k.fc
		w, v := s.evaluate(k.e)
		require.InEpsilon(t, k.root, w.counted.rootUsed, 1e-12)
		require.Equal(t, k.capped, v.concrete.rootCapped)
		s.av, s.s = 0.4, 8
		if k.e.system == units.SI {
			s.av, s.s = 258, 200
		}
		w, v = s.evaluate(k.e)
		require.InEpsilon(t, math.Sqrt(k.fc), w.counted.rootUsed, 1e-12, "with least stirrups")
		require.False(t, v.concrete.rootCapped)
		require.InEpsilon(t, k.root, w.bare.rootUsed, 1e-12, "and yet not where they are not counted")
	}
}

// bw is the least width of the web and Ag that of the whole section, hollows
// left out, for every shape. Own measures.
func TestShearSectionOfEveryShape(t *testing.T) {
	point := func(x, y float64) beam.Point { return beam.Point{X: in(x), Y: in(y)} }
	for _, k := range []struct {
		name  string
		s     beam.Section
		bw, h float64
		ag    float64
	}{
		{"rectangle", beam.Section{Shape: beam.Rectangular, Width: in(14), Depth: in(24)}, 14, 24, 336},
		{"tee", beam.Section{Shape: beam.Tee, Width: in(14), Depth: in(24), FlangeThickness: in(4), FlangeWidth: in(54)}, 14, 24, 336 + 160},
		{"ell", beam.Section{Shape: beam.Ell, Width: in(14), Depth: in(24), FlangeThickness: in(4), FlangeWidth: in(34)}, 14, 24, 336 + 80},
		{"inverted tee", beam.Section{Shape: beam.InvertedTee, Width: in(14), Depth: in(24), FlangeThickness: in(8), FlangeWidth: in(30)}, 14, 24, 336 + 128},
		// Sides that lean from 10 in. at the bottom to 18 in. at the top.
		{"trapezium", beam.Section{Shape: beam.Polygon, Outline: []beam.Point{point(4, 0), point(14, 0), point(18, 24), point(0, 24)}}, 10, 24, 14 * 24},
		// Two walls of 5 in. beside a hollow of 14 by 16 in.
		{"box", beam.Section{
			Shape: beam.Polygon, Outline: []beam.Point{point(0, 0), point(24, 0), point(24, 28), point(0, 28)},
			Voids: [][]beam.Point{{point(5, 6), point(19, 6), point(19, 22), point(5, 22)}},
		}, 10, 28, 24*28 - 14*16},
	} {
		g, faults := beam.GeometryOf(&k.s)
		require.Empty(t, faults, k.name)
		s := us19.shearSection(&k.s, &g, &beam.Concrete{Strength: psi(4900)}, &beam.Readings{ShearRow: beam.RowB, ShearMethod: beam.DetailedShear})
		s.depth, s.area, s.stirrups.yield = in(17), in2(2), psi(60000)
		w := us19.newWebShear(&s)
		require.InEpsilon(t, k.bw, w.bw, 1e-12, k.name)
		require.InEpsilon(t, k.h, w.h, 1e-12, k.name)
		require.InEpsilon(t, k.ag, w.ag, 1e-12, k.name)
		require.InEpsilon(t, 2/(17*k.bw), w.ratio, 1e-12, k.name)
		require.Equal(t, beam.RowB, w.row)
		require.Equal(t, beam.DetailedShear, w.method)
		require.InEpsilon(t, 0.1*4900*k.ag, axialLimit(t, g.Gross), 1e-12, k.name)
	}
}

// axialLimit is the compression from which 9.5.2.2 refuses a section of 4900 psi,
// in lb, found by trying.
func axialLimit(t *testing.T, gross units.Area) float64 {
	t.Helper()
	c := &beam.Concrete{Strength: psi(4900)}
	limit := units.PoundForce.Of(0.1 * 4900 * gross.In(units.SquareInch))
	require.Len(t, us19.axialRefusals(gross, c, limit, ""), 1)
	require.Empty(t, us19.axialRefusals(gross, c, limit.Scale(0.9999), ""))
	require.Empty(t, us19.axialRefusals(gross, c, limit.Neg(), ""))
	require.Empty(t, us19.axialRefusals(gross, c, units.Force{}, ""))
	return limit.In(units.PoundForce)
}
