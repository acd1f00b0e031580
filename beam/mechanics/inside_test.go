package mechanics

import (
	"math"
	"math/rand/v2"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/units"
)

// The parts of the two routes by themselves, in m, N and Pa. Numbers that are
// powers of two keep the arithmetic exact.

var metre = units.Metre.Of

func layerOf(depth, area, modulus, yield float64) Layer {
	return Layer{Depth: metre(depth), Area: units.SquareMetre.Of(area), Steel: Steel{Modulus: units.Pascal.Of(modulus), Yield: units.Pascal.Of(yield)}}
}

func lawOf(t testing.TB, law Law, err error) Law {
	t.Helper()
	require.NoError(t, err)
	return law
}

// blockOf is half of the neutral-axis depth at 1 MPa.
func blockOf(t testing.TB) Law {
	t.Helper()
	law, err := RectangularBlock(units.Pascal.Of(1<<20), 0.5, 1.0/256)
	return lawOf(t, law, err)
}

// jumping falls from 20 to 5 MPa at half the ultimate strain of 0.003.
func jumping(t testing.TB) Law {
	t.Helper()
	law, err := Curve(func(e float64) units.Stress {
		if e < 0.0015 {
			return units.Megapascal.Of(20)
		}
		return units.Megapascal.Of(5)
	}, 0.003, 0.0015)
	return lawOf(t, law, err)
}

func insideLaws(t testing.TB) map[string]Law {
	parabola, err := ParabolaRectangle(units.Megapascal.Of(20), 0.002, 0.0035, 2)
	require.NoError(t, err)
	bilinear, err := Bilinear(units.Megapascal.Of(20), 0.00175, 0.0035)
	require.NoError(t, err)
	cubic, err := Curve(func(e float64) units.Stress { return units.Megapascal.Of(20 * (1 - math.Pow(1-e/0.003, 3))) }, 0.003)
	require.NoError(t, err)
	return map[string]Law{"block": blockOf(t), "jumping": jumping(t), "parabola": parabola, "bilinear": bilinear, "cubic": cubic}
}

func insideSections() map[string]Section {
	layers := []Layer{layerOf(0.625, 0.003, 2e11, 4.2e8), layerOf(0.0625, 0.002, 2e11, 3e8), layerOf(0.25, 0.001, 2e11, 9e8)}
	widening := []Part{{Bottom: metre(1), Width: metre(0.5), BottomWidth: metre(1.5)}}
	bent := []Part{{Bottom: metre(0.25), Width: metre(0.5)}, {Top: metre(0.25), Bottom: metre(1), Width: metre(0.5), BottomWidth: metre(1.25)}}
	return map[string]Section{
		"rectangle":           {Rectangle(metre(0.375), metre(0.75)), layers},
		"tee":                 {Tee(metre(1), metre(0.125), metre(0.375), metre(0.75)), layers},
		"widens by its depth": {widening, layers},
		"begins to widen":     {bent, layers},
		"steel in the faces":  {Rectangle(metre(0.375), metre(0.625)), append(layers[:1:1], layerOf(0, 0.001, 2e11, 4e8))},
		"little steel":        {Rectangle(metre(0.375), metre(0.75)), []Layer{layerOf(0.625, 0.0001, 2e11, 4.2e8)}},
		"without steel":       {widening, nil},
	}
}

// The laws' degrees and the power of the balance decide what is worked out.
func TestDegrees(t *testing.T) {
	laws := insideLaws(t)
	for name, degree := range map[string]int{"block": 0, "bilinear": 1, "parabola": 2, "cubic": 3} {
		require.Equal(t, degree, laws[name].degree, name)
	}
	one, err := RectangularBlock(units.Pascal.Of(1), 1, 0.003)
	require.NoError(t, err)
	require.Zero(t, one.degree)
	var s Solver
	for name, section := range insideSections() {
		require.NoError(t, s.load(section, laws["block"], Bending{}))
		want := 1
		if section.Parts[len(section.Parts)-1].BottomWidth.In(units.Metre) > 0 {
			want = 2
		}
		require.Equal(t, want, s.power, name)
		require.Equal(t, 3.0, s.powerOf(3)*3/[]float64{0, 3, 9}[want])
	}
}

// At every event the running balance is the balance taken afresh, and between them
// it is the sum of the forces as reported.
func TestRunningBalance(t *testing.T) {
	for lawName, law := range insideLaws(t) {
		for name, section := range insideSections() {
			for _, bending := range []Bending{{}, {Sense: Hogging, Axial: units.Newton.Of(1e5)}, {Displaced: Ignore, Axial: units.Newton.Of(-2e5)}} {
				var s Solver
				var u Ultimate
				require.NoError(t, s.load(section, law, bending))
				g := s.balance()
				for i, e := range s.events {
					require.True(t, i == 0 || e.k <= s.events[i-1].k)
					s.pass(&g, e)
					fresh := s.balance()
					next := 0.0
					if i+1 < len(s.events) {
						next = s.events[i+1].k
					}
					for j := range g {
						require.InDelta(t, fresh[j], g[j], 1e-12*fresh.magnitude(1+e.k), "%s, %s", lawName, name)
					}
					k := (e.k + next) / 2
					if k-next < 1e-9*k || k == 0 {
						continue
					}
					size := s.report(&u, k)
					forces, sum := u.Concrete.In(units.Newton)-bending.Axial.In(units.Newton), 0.0
					sum = u.Concrete.Abs().In(units.Newton) + bending.Axial.Abs().In(units.Newton)
					for _, l := range u.Layers {
						forces += l.Force.In(units.Newton)
						sum += l.Force.Abs().In(units.Newton)
					}
					require.InEpsilon(t, sum, size, 1e-12)
					require.InDelta(t, forces, u.Residual.In(units.Newton), 1e-12*size)
					require.InDelta(t, u.Residual.In(units.Newton), g.at(k)/s.powerOf(k)*s.depth, 1e-11*fresh.magnitude(k)/s.powerOf(k), "%s, %s, k %v", lawName, name, k)
				}
			}
		}
	}
}

// What a section reports at a depth that is no equilibrium: a bar at the neutral
// axis is in no tension, one at mid-depth is not on the tension side.
func TestReport(t *testing.T) {
	var s Solver
	var u Ultimate
	section := Section{
		Parts:  Rectangle(metre(1), metre(1)),
		Layers: []Layer{layerOf(0.5, 0.25, 1<<30, 1<<20), layerOf(0.502, 0.125, 1<<30, 1<<20), layerOf(0, 0.5, 1<<30, (1<<22)*1.005)},
	}
	law := blockOf(t) // a modulus of 1 GiPa gives 4 MiPa at the ultimate strain
	require.NoError(t, s.load(section, law, Bending{Displaced: Ignore}))
	for _, e := range s.events {
		if e.k > 2 {
			g := s.balance()
			s.pass(&g, e)
		}
	}
	s.report(&u, 2)
	require.Equal(t, 0.5, u.NeutralAxis.In(units.Metre))
	require.Equal(t, 0.25, u.CompressionDepth.In(units.Metre))
	require.Equal(t, float64(1<<18), u.Concrete.In(units.Newton))
	require.Equal(t, 0.125, u.ConcreteDepth.In(units.Metre))
	require.Equal(t, 0.125, u.TensionArea.In(units.SquareMetre))
	require.InEpsilon(t, 0.502, u.EffectiveDepth.In(units.Metre), 1e-15)
	require.Equal(t, 0.125, u.TensionSideArea.In(units.SquareMetre))
	require.InEpsilon(t, 0.502, u.TensionSideDepth.In(units.Metre), 1e-15)
	require.Zero(t, u.Layers[0].Strain)
	// The bar in the face would yield just beyond the ultimate strain.
	require.Equal(t, float64(1<<22), u.Layers[2].Stress.In(units.Pascal))
}

func TestCrosses(t *testing.T) {
	var s Solver
	g := polynomial{1e6, 1e6} // 2e6 in size at 1
	for _, test := range []struct {
		before, after float64
		want          bool
	}{
		{-1, 1, true}, {-1, 0, true}, {-1e-3, 1e-3, true}, {-1, -1e-9, false}, {-1e-3, 0.5, true},
		{0, 1, false}, {0, -1, false}, {0, 0, false}, {0.5, 0.7, false}, {1, 2, false},
		{1e-9, -1e-9, true}, {1e-8, -0.9e-8, true}, {1e-8, -1.1e-8, false}, {1, -1, false}, {1e-9, 0, true}, {1e-9, 1e-10, false},
		{math.NaN(), 1, false}, {math.NaN(), -1, false},
	} {
		require.Equal(t, test.want, s.crosses(&g, 1, test.before, test.after), "%v to %v", test.before, test.after)
	}
}

// Roots on the borders of an interval.
func TestSearchOnBorders(t *testing.T) {
	line := polynomial{-1, 2} // zero at a half
	for _, test := range []struct {
		name           string
		g              polynomial
		lo, hi, before float64
		roots          []float64
		end            float64
	}{
		{"at the lower", line, 0.5, 2, math.NaN(), []float64{0.5}, 0},
		{"a rise at the upper", line, 1, 2, -1, []float64{2}, 1},
		{"a rise and the lower", line, 0.5, 2, -1, []float64{2, 0.5}, 0},
		{"a drop at the upper", polynomial{1, -2}, 1, 2, 1, nil, -1},
		{"none", line, 1, 2, 3, nil, 1},
		{"without curvature", polynomial{0, 0, 1}, 0, 2, math.NaN(), nil, 0},
	} {
		t.Run(test.name, func(t *testing.T) {
			s := Solver{power: 1}
			require.Equal(t, test.end, s.search(&test.g, 2, test.lo, test.hi, test.before))
			require.Equal(t, test.roots, s.roots)
		})
	}
	// With no curvature in reach the powers of k are taken out of both ends: a drop
	// by a last bit at 4 is none of 16 times that.
	for power, lift := range map[int]float64{1: 4, 2: 16} {
		var g polynomial
		g[power] = -1
		s := Solver{power: power}
		require.Equal(t, -1.0, s.search(&g, 2, 0, 4, lift*0x1p-54))
		require.Equal(t, []float64(nil), s.roots)
		g = polynomial{}
		g[power] = -0x1p-60
		g[power+1] = 1
		s = Solver{power: power}
		s.search(&g, 2, 0, 4, -lift)
		require.Equal(t, 4.0, s.roots[0])
		// A drop to zero, of 1.5e-14 where 2 is lost in rounding to 2e-14.
		g = polynomial{}
		g[power], g[power+1] = -1, 0.25
		s = Solver{power: power}
		s.search(&g, 2, 0, 4, lift*1.5e-14)
		require.Equal(t, 4.0, s.roots[0])
	}
}

// A root that is a little off is brought back by Newton's steps, whatever power of
// k the balance has; one that is far off is left.
func TestSettle(t *testing.T) {
	for lawName, law := range insideLaws(t) {
		for name, section := range insideSections() {
			if len(section.Layers) == 0 {
				continue
			}
			for _, axial := range []float64{0, 3e5} {
				var s Solver
				var u, off Ultimate
				require.NoError(t, s.Ultimate(&u, section, law, Bending{Axial: units.Newton.Of(axial)}))
				k := s.roots[0]
				// Walk to the interval of the root, as the search does.
				require.NoError(t, s.load(section, law, Bending{Axial: units.Newton.Of(axial)}))
				g := s.balance()
				for _, e := range s.events {
					if e.k > k {
						s.pass(&g, e)
					}
				}
				g = s.balance()
				for _, divided := range []bool{false, true} {
					p := g
					if divided {
						s.divide(&p)
					}
					if divided && math.Abs(p.at(k)) > 1e-9*p.magnitude(k) {
						continue // only where every edge is on its last piece
					}
					s.roots = append(s.roots[:0], k*(1+3e-9))
					got := s.settle(&off, &p, divided)
					size := s.report(&u, k)
					require.InEpsilon(t, k, got, 1e-12, "%s, %s", lawName, name)
					require.LessOrEqual(t, math.Abs(off.Residual.In(units.Newton)), 2e-13*size, "%s, %s", lawName, name)
					require.InEpsilon(t, s.depth/got, off.NeutralAxis.In(units.Metre), 1e-15)
					for _, far := range []float64{1.3e-6, -1.3e-6, 1e-4} {
						s.roots = append(s.roots[:0], k*(1+far))
						got = s.settle(&off, &p, divided)
						require.Equal(t, s.roots[0], got, "%s, %s", lawName, name)
						require.InEpsilon(t, s.depth/got, off.NeutralAxis.In(units.Metre), 1e-15)
					}
				}
			}
		}
	}
}

// A law that falls lets the concrete that a bar displaces drop: the forces leap
// over zero as the bar passes the strain of the fall, and that depth is the
// equilibrium. With c = 200 mm: 750 kN of concrete, 900 of the upper bar, 840 of
// the lower, and 60 of displaced concrete before or 15 after.
func TestEquilibriumAtALeap(t *testing.T) {
	section := Section{Parts: Rectangle(metre(0.3), metre(0.6)), Layers: []Layer{layerOf(0.54, 0.002, 2e11, 4.2e8), layerOf(0.1, 0.003, 2e11, 4.2e8)}}
	law := jumping(t)
	for _, axial := range []float64{750e3 - 0.5, 750e3 + 0.5, 770e3, 795e3 - 0.5} {
		b := Bending{Axial: units.Newton.Of(axial)}
		u, err := section.Ultimate(law, b)
		require.NoError(t, err)
		require.Equal(t, 1, u.Equilibria)
		require.InEpsilon(t, 0.2, u.NeutralAxis.In(units.Metre), 1e-6)
		f, err := section.Fibres(law, b)
		require.NoError(t, err)
		require.Equal(t, 1, f.Equilibria)
		require.InEpsilon(t, 0.2, f.NeutralAxis.In(units.Metre), 1e-6)
		require.InEpsilon(t, 750e3, u.Concrete.In(units.Newton), 1e-6)
	}
}

// The neutral axis at which concrete in one rectangle has a moment about steel: c
// of c·(1 - c/4) = moment over force.
func TestAxisInRectangle(t *testing.T) {
	law := blockOf(t)
	const force = 1 << 19 // over a width of 1 m, a metre of neutral axis
	load := func(parts []Part) *Solver {
		var s Solver
		require.NoError(t, s.load(Section{Parts: parts, Layers: []Layer{layerOf(1, 1, 1<<30, 1<<20)}}, law, Bending{}))
		return &s
	}
	for _, test := range []struct {
		name  string
		parts []Part
		want  float64
		k     float64 // zero for none
	}{
		{"rectangle", Rectangle(metre(1), metre(1)), 0.4375 * force, 2},
		{"deeper section", Rectangle(metre(1), metre(2)), 0.4375 * force, 4},
		{"block as deep as a flange", Tee(metre(1), metre(0.25), metre(0.5), metre(1)), 0.4375 * force, 2},
		{"block deeper than a flange", Tee(metre(1), metre(0.249), metre(0.5), metre(1)), 0.4375 * force, 0},
		{"block within a flange", Tee(metre(1), metre(0.26), metre(0.5), metre(1)), 0.4375 * force, 2},
		{"too great", Rectangle(metre(1), metre(1)), 1.01 * force, 0},
		{"nothing", Rectangle(metre(1), metre(1)), 0, 0},
		{"negative", Rectangle(metre(1), metre(1)), -force, 0},
		{"tapers", Trapezoid(metre(1), metre(2), metre(1)), 0.4375 * force, 0},
		{"tapers the other way", Trapezoid(metre(1), metre(0.5), metre(1)), 0.4375 * force, 0},
	} {
		t.Run(test.name, func(t *testing.T) {
			k, ok := load(test.parts).axisInRectangle(test.want)
			require.Equal(t, test.k > 0, ok)
			require.Equal(t, test.k, k)
		})
	}
	c, ok := axisFor(1, 0.5, 1, 0.5)
	require.True(t, ok, "the greatest moment")
	require.Equal(t, 1.0, c)
	c, ok = axisFor(1, 0.5, 1, 0.500001)
	require.False(t, ok)
	require.Zero(t, c)
}

// Steel at the depth of the neutral axis has no stress: the greatest moment itself
// is out of reach.
func TestRequiredTensionAtTheNeutralAxis(t *testing.T) {
	steel := Steel{Modulus: units.Pascal.Of(1 << 30), Yield: units.Pascal.Of(1 << 20)}
	_, err := RequiredTension(metre(1), metre(1), blockOf(t), steel, units.NewtonMetre.Of(0.75*(1<<19)))
	require.Equal(t, &UnreachableError{Moment: units.NewtonMetre.Of(0.75 * (1 << 19)), Greatest: units.NewtonMetre.Of(0.75 * (1 << 19))}, err)
}

// Areas up to 1e8 m2 are given. The steel lies at the centroid, so that a pull adds
// to it what it is over the yield stress of 1 Pa, and nothing else.
func TestGreatestAreas(t *testing.T) {
	law := blockOf(t)
	parts := Rectangle(metre(1), metre(1))
	weak := layerOf(0.5, 1, 1<<20, 1)
	moment := units.NewtonMetre.Of(1 << 10)
	var s Solver
	alone, err := s.RequiredTension(parts, law, Bending{}, weak, moment)
	require.NoError(t, err)
	pull := func(area float64) Bending {
		return Bending{Axial: units.Newton.Of(alone.In(units.SquareMetre) - area)}
	}
	for _, area := range []float64{9e7, 1e8} {
		got, err := s.RequiredTension(parts, law, pull(area), weak, moment)
		require.NoError(t, err)
		require.InEpsilon(t, area, got.In(units.SquareMetre), 1e-15)
	}
	var unreachable *UnreachableError
	_, err = s.RequiredTension(parts, law, pull(1.005e8), weak, moment)
	require.ErrorAs(t, err, &unreachable)

	// Compression steel of 1 Pa: the couple over a quarter of a metre.
	upper := layerOf(0.25, 1, 1<<20, 1)
	strong := layerOf(0.5, 1, 1<<37, 1<<28)
	c := 0.5 / 3 // at twice the ultimate strain in the steel
	most := (1 << 19) * c * (0.5 - c/4)
	near := upper
	near.Depth = metre(0.0625)
	for _, area := range []float64{1, 9e7} {
		_, added, err := s.RequiredBoth(parts, law, Bending{Displaced: Ignore}, strong, near, 2.0/256, units.NewtonMetre.Of(most+area*0.4375))
		require.NoError(t, err)
		require.InEpsilon(t, area, added.In(units.SquareMetre), 1e-9)
	}
	_, _, err = s.RequiredBoth(parts, law, Bending{Displaced: Ignore}, strong, near, 2.0/256, units.NewtonMetre.Of(most+1.005e8*0.4375))
	require.ErrorAs(t, err, &unreachable)
	// And of the tension steel.
	near = layerOf(0.0625, 1, 1<<37, 1<<28)
	both, _, err := s.RequiredBoth(parts, law, Bending{Displaced: Ignore}, weak, near, 2.0/256, units.NewtonMetre.Of(most+1e3))
	require.NoError(t, err)
	for _, area := range []float64{9e7, 1e8} {
		got, _, err := s.RequiredBoth(parts, law, Bending{Displaced: Ignore, Axial: units.Newton.Of(both.In(units.SquareMetre) - area)}, weak, near, 2.0/256, units.NewtonMetre.Of(most+1e3))
		require.NoError(t, err)
		require.InEpsilon(t, area, got.In(units.SquareMetre), 1e-9)
	}
	_, _, err = s.RequiredBoth(parts, law, Bending{Displaced: Ignore, Axial: units.Newton.Of(both.In(units.SquareMetre) - 1.005e8)}, weak, near, 2.0/256, units.NewtonMetre.Of(most+1e3))
	require.ErrorAs(t, err, &unreachable)
	// Half a newton more than the concrete balances takes compression steel.
	_, added, err := s.RequiredBoth(parts, law, Bending{Displaced: Ignore, Axial: units.Newton.Of((1<<19)*c + 0.5)}, strong, near, 2.0/256, units.NewtonMetre.Of(1))
	require.NoError(t, err)
	require.InEpsilon(t, 0.5/(1<<28), added.In(units.SquareMetre), 1e-6)
}

// An area of less than a square millimetre, and one that a pull needs before any
// moment, are found as the formula finds them.
func TestRequiredAreaOfLittle(t *testing.T) {
	law := blockOf(t)
	parts := Rectangle(metre(1), metre(1))
	steel := layerOf(0.875, 1, 1<<37, 1<<28)
	var s Solver
	for _, b := range []Bending{{}, {Axial: units.Newton.Of(-1e5)}} {
		moment := units.NewtonMetre.Of(20)
		if b.Axial.Less(units.Force{}) {
			moment = units.NewtonMetre.Of(6e4)
		}
		want, err := s.RequiredTension(parts, law, b, steel, moment)
		require.NoError(t, err)
		got, err := s.RequiredArea(Section{Parts: parts, Layers: []Layer{steel}}, 0, law, b, moment)
		require.NoError(t, err)
		require.InEpsilon(t, want.In(units.SquareMetre), got.In(units.SquareMetre), 1e-9)
		require.Positive(t, got.In(units.SquareMetre))
	}
	bad := steel
	bad.Steel = Steel{}
	_, err := s.RequiredArea(Section{Parts: parts, Layers: []Layer{bad}}, 0, law, Bending{}, units.NewtonMetre.Of(20))
	require.Error(t, err)
	// The concrete's own figures ask nothing of steel.
	_, err = Section{Parts: parts, Layers: []Layer{bad}}.Gross()
	require.NoError(t, err)
}

// The fibres where a force is balanced at the very point of a scan.
func TestFibresBalancedAtAPoint(t *testing.T) {
	m := newFibreModel(Section{Parts: Rectangle(metre(1), metre(1))}, blockOf(t), Bending{})
	require.Equal(t, []float64{2}, m.borders())
	low, high := 1e-16, 2*(1-1e-13)
	for i := range 5 {
		c := low + (high-low)*float64(i)/4
		m.axial = m.sum(c).concrete
		require.Zero(t, m.sum(c).force)
		require.Equal(t, []float64{c}, m.equilibria(), "%d", i)
	}
	// Very near the face.
	m.axial = 1e-9 * (1 << 19)
	got := m.equilibria()
	require.Len(t, got, 1)
	require.InEpsilon(t, 1e-9, got[0], 1e-9)
}

// Just below the last border, and far below a thin section.
func TestFibresBelowTheSection(t *testing.T) {
	law, err := Bilinear(units.Megapascal.Of(20), 0.003, 0.003)
	require.NoError(t, err)
	for _, height := range []float64{0.1, 1, 10} {
		for _, c := range []float64{1.004, 1.5, 3, 100} {
			// The stress falls in a line from 20 MPa to 20·(1 - 1/c).
			axial := 20e6 * height * (1 - 0.5/c)
			f, err := Section{Parts: Rectangle(metre(1), metre(height))}.Fibres(law, Bending{Axial: units.Newton.Of(axial)})
			require.NoError(t, err)
			require.Equal(t, 1, f.Equilibria)
			require.InEpsilon(t, c*height, f.NeutralAxis.In(units.Metre), 1e-9)
		}
	}
	// As far as the search goes, 1e9 times the depth, the mean stress is that of
	// half the depth over it less.
	_, err = Section{Parts: Rectangle(metre(1), metre(0.5))}.Fibres(law, Bending{Axial: units.Newton.Of(1e9)})
	var none *NoEquilibriumError
	require.ErrorAs(t, err, &none)
	require.InDelta(t, 0.5e-9, 1-none.Most.In(units.Newton)/1e7, 2e-12)
}

// A bar within a billionth of the depth of the face is in it, and always in
// compression: it cannot take a pull.
func TestFibresOfSteelInTheFace(t *testing.T) {
	law := blockOf(t)
	for _, height := range []float64{0.5, 2} {
		for _, test := range []struct {
			at     float64
			inFace bool
		}{{0, true}, {0.9e-9, true}, {1.1e-9, false}, {1e-7, false}} {
			s := Section{Parts: Rectangle(metre(1), metre(height)), Layers: []Layer{layerOf(test.at*height, 1e-3, 1<<37, 1<<28)}}
			b := Bending{Axial: units.Newton.Of(-1e5)}
			_, err := s.Fibres(law, b)
			_, other := s.Ultimate(law, b)
			require.Equal(t, test.inFace, err != nil, "%v", test)
			require.Equal(t, test.inFace, other != nil, "%v", test)
		}
	}
	s := Section{Parts: Rectangle(metre(1), metre(1)), Layers: []Layer{layerOf(1e-9, 1, 1<<37, 1<<28)}}
	_, err := s.Ultimate(law, Bending{Axial: units.Newton.Of(-1e5)})
	require.NoError(t, err, "a billionth itself is below the face")
	_, err = s.Fibres(law, Bending{Axial: units.Newton.Of(-1e5)})
	require.NoError(t, err, "a billionth itself is below the face")
}

// Steel that yields at the ultimate strain itself.
func TestFibresOfSteelThatYieldsAtTheEnd(t *testing.T) {
	law, err := RectangularBlock(units.Megapascal.Of(25), 0.8, 0.003)
	require.NoError(t, err)
	s := Section{Parts: Rectangle(metre(0.3), metre(0.6)), Layers: []Layer{layerOf(0.54, 0.002, 2e11, 6e8), layerOf(0.06, 0.001, 2e11, 6e8)}}
	for _, axial := range []float64{0, 3e6, 5.9e6} {
		b := Bending{Axial: units.Newton.Of(axial)}
		u, err := s.Ultimate(law, b)
		require.NoError(t, err)
		f, err := s.Fibres(law, b)
		require.NoError(t, err)
		require.InEpsilon(t, f.NeutralAxis.In(units.Metre), u.NeutralAxis.In(units.Metre), 1e-10)
		require.InEpsilon(t, f.Nominal.In(units.NewtonMetre), u.Nominal.In(units.NewtonMetre), 1e-9)
	}
}

// A function is asked for stresses of strains that it has, and for enough of them.
func TestFitAsksWithinTheLaw(t *testing.T) {
	curve := func(f func(s float64) float64, kinks ...float64) (Law, error) {
		return Curve(func(e float64) units.Stress {
			require.GreaterOrEqual(t, e, 0.0)
			require.LessOrEqual(t, e, 1.0/64)
			return units.Pascal.Of(f(e * 64))
		}, 1.0/64, kinks...)
	}
	law, err := curve(func(s float64) float64 { return 1e6 * (1 + s) })
	require.NoError(t, err)
	require.Len(t, law.Kinks(), 1)
	// Steep at zero: pieces thinner than a millionth.
	law, err = curve(func(s float64) float64 { return 1e6 * math.Pow(s, 0.8) })
	require.NoError(t, err)
	for i := range 100 {
		s := math.Pow(10, -float64(i)/10)
		require.InDelta(t, 1e6*math.Pow(s, 0.8), law.Stress(s/64).In(units.Pascal), 2e-3)
	}
	// Thin pieces between jumps, at either end.
	const thin = 0x1p-19
	for _, from := range []float64{0, 0.5, 1 - 2*thin} {
		kinks := []float64{(from + thin) / 64}
		if from > 0 {
			kinks = append([]float64{from / 64}, kinks...)
		}
		law, err = curve(func(s float64) float64 {
			if s >= from && s < from+thin {
				return 1e6 * (s - from) / thin
			}
			return 3e6
		}, kinks...)
		require.NoError(t, err)
		require.Len(t, law.Kinks(), len(kinks)+1)
		require.InEpsilon(t, 0.5e6, law.Stress((from+thin/2)/64).In(units.Pascal), 1e-7)
		require.InEpsilon(t, 3e6, law.Stress((from+thin)/64).In(units.Pascal), 1e-9)
	}
	_, err = curve(func(s float64) float64 {
		if s*512 == math.Trunc(s*512) {
			return 1e6 // where it is tried first
		}
		return math.NaN()
	})
	require.ErrorContains(t, err, "too rough")
}

// Where the peak is the ultimate strain there is no piece beyond it.
func TestPeakAtTheEnd(t *testing.T) {
	law, err := ParabolaRectangle(units.Megapascal.Of(20), 0.003, 0.003, 2)
	require.NoError(t, err)
	require.Equal(t, []float64{0}, law.Kinks())
	law, err = ParabolaRectangle(units.Megapascal.Of(20), math.Nextafter(0.003, 0), 0.003, 2)
	require.NoError(t, err)
	require.Len(t, law.Kinks(), 2)
}

// Newton's steps are few; their number is held, for it is what a slip in them costs.
func TestNewtonsSteps(t *testing.T) {
	for _, test := range []struct {
		name   string
		p      polynomial
		lo, hi float64
		x      float64
		root   float64
		steps  int
	}{
		{"cubic", withRoots(1, -1, 3, 20), 0, 8, 4, 3, 6},
		{"cubic from afar", withRoots(1, -1, 3, 20), 0, 8, 7.99, 3, 6},
		{"quintic", withRoots(-2, -1, -3, 3, 20, 30), 0, 8, 7, 3, 6},
		{"level at the root", withRoots(1, 3, 3, 3), 0, 8, 4, 3, 24},
		{"steps leave the bracket", polynomial{-1, 0, 0, 0, 0, 1}, 0, 64, 0.0625, 1, 14},
		{"a step of more than half the bracket", polynomial{-7.5, 1}, 4, 8, 4.5, 7.5, 3},
		{"a step of half the bracket", polynomial{-7.5, 1}, 4, 8, 5.5, 7.5, 1},
		{"a step of nearly half the bracket", polynomial{-7.49, 1}, 4, 8, 5.5, 7.49, 1},
		{"root at the upper end", polynomial{-8, 1}, 4, 8, 6.5, 8, 50},
		{"root at the lower end", polynomial{-4, 1}, 4, 8, 5.5, 4, 50},
		{"great root", withRoots(1, -1, 3000.1, 7000), 100, 5000, 1000, 3000.1, 24},
		{"small root", withRoots(1, -1, 0.0031, 7000), 0, 1, 0.5, 0.0031, 7},
		{"hit at once", withRoots(1, -1, 3, 20), 0, 8, 3, 3, 0},
	} {
		t.Run(test.name, func(t *testing.T) {
			root, steps := test.p.newton(test.lo, test.hi, test.x, test.p.at(test.hi) >= 0)
			require.InEpsilon(t, test.root, root, 1e-5)
			require.Equal(t, test.steps, steps)
		})
	}
}

// Of two roots of unlike sign, or of a line, the one in the interval, its ends
// included.
func TestQuadraticRoot(t *testing.T) {
	for _, test := range []struct {
		name   string
		p      polynomial
		lo, hi float64
		x      float64
		ok     bool
	}{
		{"line", polynomial{-6, 2}, 0, 8, 3, true},
		{"line that falls", polynomial{6, -2}, 0, 8, 3, true},
		{"unlike", withRoots(1, -4, 3), 0, 8, 3, true},
		{"unlike, the other branch", withRoots(1, 3, -1), 0, 8, 3, true},
		{"falling", withRoots(-2, 3, -1), 0, 8, 3, true},
		{"at the lower end", withRoots(1, -4, 3), 3, 8, 3, true},
		{"at the upper end", withRoots(1, -4, 3), 1, 3, 3, true},
		{"the other branch at the lower end", withRoots(1, 3, -1), 3, 8, 3, true},
		{"the other branch at the upper end", withRoots(1, 3, -1), 1, 3, 3, true},
		{"alike", withRoots(1, 1, 3), 2, 8, 0, false},
		{"alike and near zero", withRoots(1, 0.25, 2), 1, 8, 0, false},
		{"pure square", polynomial{-9, 0, 1}, 0, 8, 3, true},
	} {
		t.Run(test.name, func(t *testing.T) {
			x, ok := test.p.quadraticRoot(test.lo, test.hi)
			require.Equal(t, test.ok, ok)
			require.Equal(t, test.x, x)
		})
	}
	_, ok := (&polynomial{-12, 1, 1}).quadraticRoot(4, 8)
	require.False(t, ok, "3 is below")
	_, ok = (&polynomial{-12, 1, 1}).quadraticRoot(0, 2)
	require.False(t, ok, "3 is above")
	_, ok = (&polynomial{-3, -2, 1}).quadraticRoot(4, 8)
	require.False(t, ok, "3 is below, of the other branch")
	_, ok = (&polynomial{-3, -2, 1}).quadraticRoot(0, 2)
	require.False(t, ok, "3 is above, of the other branch")
}

func TestFirstGuess(t *testing.T) {
	for _, test := range []struct {
		first, last, want float64
	}{
		{-1, 3, 4}, {1, -3, 4}, {-1, 1, 6}, // the chord from 2 to 10
		{2, 2, 6}, {0, 0, 6}, {0, 1, 6}, {-1, 0, 6}, // no chord, or through an end
		{-1, 1023, 6}, {-1, 1021, 2 + 8.0/1022}, {-1023, 1, 6}, {-1021, 1, 2 + 8*1021.0/1022}, {-1, 1025, 6}, {-1, 1028, 6},
	} {
		b := polynomial{test.first, 0, 0, test.last}
		require.InEpsilon(t, test.want, firstGuess(&b, 3, 2, 10), 1e-15, "%v, %v", test.first, test.last)
	}
}

// Pairs of roots: one where they coincide, two where they are a millionth apart,
// none where they just miss.
func TestPairsOfRoots(t *testing.T) {
	rng := rand.New(rand.NewPCG(3, 7))
	touched := 0
	for range 200 {
		r := 0.5 + 7*rng.Float64()
		scale := math.Ldexp(1, rng.IntN(40)-10)
		for _, hi := range []float64{8, 1000} {
			r := r * hi / 8
			got := rootsOf(withRoots(scale, r, r), 2, 0, hi)
			for _, x := range got {
				touched++
				require.InEpsilon(t, r, x, 1e-6)
			}
			got = rootsOf(withRoots(scale, r, r*(1+0x1p-20)), 2, 0, hi)
			require.Len(t, got, 2)
			miss := withRoots(scale, r, r)
			miss[0] += scale * r * r * 1e-12
			require.Empty(t, rootsOf(miss, 2, 0, hi))
		}
	}
	require.Greater(t, touched, 100)
}

// An interval too narrow for two roots to be told apart, with coefficients that say
// there may be: its middle is the root, if the polynomial is lost in rounding there.
func TestRootsThatCannotBeToldApart(t *testing.T) {
	bends := polynomial{1, -1, 1}
	for _, test := range []struct {
		name   string
		p      polynomial
		lo, hi float64
		want   []float64
	}{
		{"zero itself", polynomial{}, 4, 4 * (1 + 0x1p-44), []float64{4 * (1 + 0x1p-45)}},
		{"touches", withRoots(1<<20, 3, 3), 3 - 0x1p-44, 3 + 0x1p-44, []float64{3}},
		{"nearly touches", polynomial{9*(1<<20) + 0x1p-24, -6 * (1 << 20), 1 << 20}, 3 - 0x1p-44, 3 + 0x1p-44, []float64{3}},
		{"misses by little", polynomial{9 + 1e-9, -6, 1}, 3 - 0x1p-44, 3 + 0x1p-44, nil},
		{"misses", polynomial{1}, 3 - 0x1p-44, 3 + 0x1p-44, nil},
		{"misses far out", polynomial{1}, 1e6, 1e6 + 1e-7, nil},
		{"misses over a billionth of a thousandth", polynomial{1}, 1e12 - 1, 1e12, nil},
		{"not so narrow", polynomial{1}, 1, 1 + 0x1p-24, []float64{1 + 0x1p-25}},
	} {
		t.Run(test.name, func(t *testing.T) {
			require.Equal(t, test.want, test.p.appendRoots(nil, &bends, 2, test.lo, test.hi))
		})
	}
}

// After two thousand pieces no more are halved.
func TestMostPieces(t *testing.T) {
	for _, straight := range []int{2000, 2001} {
		kinks := make([]float64, straight)
		for i := range kinks {
			kinks[i] = 0.003 * float64(i+1) / float64(straight+1)
		}
		last := kinks[straight-1]
		_, err := Curve(func(e float64) units.Stress {
			if e > last {
				return units.Pascal.Of(1e6 * (1 + 2e-7*math.Pow((e-last)/(0.003-last), 4))) // a cubic for each half
			}
			return units.Pascal.Of(1e6)
		}, 0.003, kinks...)
		require.Equal(t, straight > 2000, err != nil, "%v", err)
	}
}

// Ends of the same sign enclose no root of a block, unless the balance has changed
// its sign at the border.
func TestBare(t *testing.T) {
	block, rising := Law{pieces: make([]piece, 1)}, Law{degree: 1, pieces: make([]piece, 1)}
	line, square := polynomial{-3, 1}, polynomial{-4, 0, 1}
	for _, test := range []struct {
		name           string
		law            Law
		power          int
		g              polynomial
		lo, hi, before float64
		end            float64
		bare           bool
	}{
		{"law that may fall", rising, 1, line, 4, 8, math.NaN(), 0, false},
		{"above", block, 1, line, 4, 8, math.NaN(), 1, true},
		{"below", block, 1, line, 1, 2, math.NaN(), -2, true},
		{"across", block, 1, line, 1, 8, math.NaN(), -2, false},
		{"at the lower end", block, 1, line, 3, 8, math.NaN(), 0, false},
		{"at the upper end", block, 1, line, 1, 3, math.NaN(), -2, false},
		{"small", block, 1, polynomial{-3e-3, 1e-3}, 4, 8, math.NaN(), 1e-3, true},
		{"above, as before", block, 1, line, 4, 8, 7, 1, true},
		{"above, from below", block, 1, line, 4, 8, -7, 1, false},
		{"above, from a little below", block, 1, polynomial{0.25}, 4, 8, -0.25, 0.25, false},
		{"above, from zero", block, 1, line, 4, 8, 0, 1, true},
		{"below, from zero", block, 1, line, 1, 2, 0, -2, true},
		{"below, from above", block, 1, line, 1, 2, 7, -2, false},
		{"square, above", block, 1, square, 3, 8, math.NaN(), 5, true},
		{"square, below", block, 1, square, 0.5, 1, math.NaN(), -3.75, true},
		{"square, across", block, 1, square, 1, 3, math.NaN(), -3, false},
		{"square of three terms", block, 1, polynomial{-2, 4, 3}, 0.25, 2, math.NaN(), -0.8125, false},
		{"tapers, above", block, 2, polynomial{-8, 0, 0, 1}, 3, 8, math.NaN(), 19, true},
		{"tapers, across", block, 2, polynomial{-8, 0, 0, 1}, 1, 8, math.NaN(), -7, false},
		{"without curvature", block, 1, polynomial{1e-9, 2, 3}, 0, 8, math.NaN(), 2, true},
		{"without curvature, across", block, 1, polynomial{1e-9, -2, 3}, 0, 8, math.NaN(), -2, false},
		{"without curvature, just not across", block, 1, polynomial{9, -2, 0.2}, 0, 8, math.NaN(), -2, true},
		{"without curvature, of falling terms", block, 1, polynomial{9, 2, -3}, 0, 8, math.NaN(), 2, false},
		{"tapers without curvature", block, 2, polynomial{9, 9, 2, 3}, 0, 8, math.NaN(), 2, true},
		{"tapers without curvature, across", block, 2, polynomial{9, 9, 2, -3}, 0, 8, math.NaN(), 2, false},
	} {
		t.Run(test.name, func(t *testing.T) {
			s := Solver{law: test.law, power: test.power}
			end, bare := s.bare(&test.g, test.lo, test.hi, test.before)
			require.Equal(t, test.bare, bare)
			require.InDelta(t, test.end, end, 1e-15)
		})
	}
}

func TestDistinct(t *testing.T) {
	require.Equal(t, []float64{100, 50}, distinct([]float64{100, 100, 50, 50}))
	require.Len(t, distinct([]float64{100, 100 * (1 - 9e-11), 50}), 2)
	require.Len(t, distinct([]float64{100, 100 * (1 - 1.1e-10), 50}), 3)
	require.Len(t, distinct([]float64{0.01, 0.01 * (1 - 1e-9)}), 2)
}
