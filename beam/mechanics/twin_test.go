package mechanics

import (
	"fmt"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/units"
)

// The hand-written twin of the kernel, for the benchmarks: a rectangle or a tee,
// the rectangular block and plain float64, for sagging without axial force, and
// nothing else. It does the same work: layers of any number, displaced concrete
// deducted inside the block, the least of the equilibria, what each layer does,
// and the moment.
type twin struct {
	width, intensity, factor, ultimate float64
	overhangs, flange, middle          float64 // of a tee: both widths, thickness; centroid
	layers                             []twinLayer
}

type twinLayer struct {
	depth, area, modulus, yield      float64
	strain, stress, displaced, force float64
}

// balance returns compression less tension with the neutral axis at c.
func (t *twin) balance(c float64) float64 {
	a := t.factor * c
	sum := t.intensity * (t.width*a + t.overhangs*min(a, t.flange))
	for i := range t.layers {
		l := &t.layers[i]
		f := l.modulus * t.ultimate * (c - l.depth) / c
		if f > l.yield {
			f = l.yield
		} else if f < -l.yield {
			f = -l.yield
		}
		if l.depth < a {
			f -= t.intensity
		}
		sum += l.area * f
	}
	return sum
}

// solve finds the least depth by halving and returns it with the moment. The
// balance falls only where the edge of the block passes a layer, so that the
// first such depth with a balance above zero just before it closes the bracket.
func (t *twin) solve(height float64) (c, moment float64) {
	lo, hi := 0.0, 2*height
	for i := range t.layers {
		at := t.layers[i].depth / t.factor
		switch {
		case at <= lo || at >= hi:
		case t.balance(at) >= 0: // the layer is not yet inside
			hi = at
		}
	}
	for hi-lo > 1e-13*hi {
		mid := (lo + hi) / 2
		if t.balance(mid) < 0 {
			lo = mid
		} else {
			hi = mid
		}
	}
	c = (lo + hi) / 2
	a := t.factor * c
	moment = t.intensity * t.width * a * (t.middle - a/2)
	if t.overhangs > 0 {
		over := min(a, t.flange)
		moment += t.intensity * t.overhangs * over * (t.middle - over/2)
	}
	for i := range t.layers {
		l := &t.layers[i]
		l.strain = t.ultimate * (c - l.depth) / c
		l.stress = max(-l.yield, min(l.yield, l.modulus*l.strain))
		l.displaced = 0
		if l.depth < a {
			l.displaced = t.intensity
		}
		l.force = l.area * (l.stress - l.displaced)
		moment += l.force * (t.middle - l.depth)
	}
	return c, moment
}

// beamOf returns the same invented beam for both, with n layers.
func beamOf(tb testing.TB, n int) (Section, Law, twin) {
	tb.Helper()
	law, err := RectangularBlock(units.Megapascal.Of(25.5), 0.85, 0.003)
	require.NoError(tb, err)
	steel := Steel{Modulus: units.Megapascal.Of(200000), Yield: units.Megapascal.Of(420)}
	s := Section{Parts: Rectangle(units.Millimetre.Of(350), units.Millimetre.Of(700))}
	t := twin{width: 350, middle: 350, intensity: 25.5, factor: 0.85, ultimate: 0.003}
	for i := range n {
		depth := 640 - 580*float64(i)/float64(max(1, n-1))
		area := 3000 / float64(1+i*i)
		s.Layers = append(s.Layers, Layer{Depth: units.Millimetre.Of(depth), Area: units.SquareMillimetre.Of(area), Steel: steel})
		t.layers = append(t.layers, twinLayer{depth: depth, area: area, modulus: 200000, yield: 420})
	}
	return s, law, t
}

// teeOf returns such a beam with a flange.
func teeOf(tb testing.TB, n int) (Section, Law, twin) {
	tb.Helper()
	s, law, t := beamOf(tb, n)
	mm := units.Millimetre.Of
	s.Parts = Tee(mm(900), mm(120), mm(350), mm(700))
	t.overhangs, t.flange = 550, 120
	t.middle = (550*120*60 + 350*700*350) / (550*120 + 350*700.0)
	return s, law, t
}

func TestTwinAgrees(t *testing.T) {
	for n := 1; n <= 60; n++ {
		beam := beamOf
		if n > 30 {
			beam = func(tb testing.TB, n int) (Section, Law, twin) { return teeOf(tb, n-30) }
		}
		s, law, tw := beam(t, n)
		u, err := s.Ultimate(law, Bending{})
		require.NoError(t, err)
		c, moment := tw.solve(700)
		require.InEpsilon(t, c, u.NeutralAxis.In(units.Millimetre), 1e-11)
		require.InEpsilon(t, moment, u.Nominal.In(units.NewtonMillimetre), 1e-11)
	}
}

func TestSolverAllocatesNothing(t *testing.T) {
	for _, n := range []int{1, 2, 6, 30} {
		s, law, _ := beamOf(t, n)
		var solver Solver
		var u Ultimate
		allocations := testing.AllocsPerRun(100, func() {
			if err := solver.Ultimate(&u, s, law, Bending{}); err != nil {
				t.Fatal(err)
			}
		})
		require.Zero(t, allocations, "%d layers", n)
		allocations = testing.AllocsPerRun(100, func() {
			if _, err := s.Cracked(8, Hogging); err != nil {
				t.Fatal(err)
			}
		})
		require.Zero(t, allocations, "cracked, %d layers", n)
	}
	// The same of a tee, and of one whose web tapers.
	s, law, _ := teeOf(t, 6)
	for _, below := range []float64{0, 300} {
		s.Parts[1].BottomWidth = units.Millimetre.Of(below)
		var solver Solver
		var u Ultimate
		require.Zero(t, testing.AllocsPerRun(100, func() {
			if err := solver.Ultimate(&u, s, law, Bending{Sense: Hogging}); err != nil {
				t.Fatal(err)
			}
			if _, err := s.Cracked(8, Sagging); err != nil {
				t.Fatal(err)
			}
		}))
	}
}

// BenchmarkUltimate times the kernel beside its twin; the ratio of the two is
// the price of the general section, the general law and the typed edges.
func BenchmarkUltimate(b *testing.B) {
	for _, n := range []int{1, 2, 4, 10, 30} {
		s, law, tw := beamOf(b, n)
		b.Run(fmt.Sprintf("layers=%d/solver", n), func(b *testing.B) {
			var solver Solver
			var u Ultimate
			b.ReportAllocs()
			for b.Loop() {
				if err := solver.Ultimate(&u, s, law, Bending{}); err != nil {
					b.Fatal(err)
				}
			}
		})
		b.Run(fmt.Sprintf("layers=%d/twin", n), func(b *testing.B) {
			for b.Loop() {
				tw.solve(700)
			}
		})
	}
}

// BenchmarkTee times a tee of six layers beside its twin, and what a tapering web
// costs.
func BenchmarkTee(b *testing.B) {
	s, law, tw := teeOf(b, 6)
	for _, below := range []float64{350, 300} {
		s.Parts[1].BottomWidth = units.Millimetre.Of(below)
		b.Run(fmt.Sprintf("below=%v/solver", below), func(b *testing.B) {
			var solver Solver
			var u Ultimate
			b.ReportAllocs()
			for b.Loop() {
				if err := solver.Ultimate(&u, s, law, Bending{}); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
	b.Run("twin", func(b *testing.B) {
		for b.Loop() {
			tw.solve(700)
		}
	})
}

func BenchmarkCurvature(b *testing.B) {
	s, _, _ := teeOf(b, 6)
	law, err := ParabolaRectangle(units.Megapascal.Of(30), 0.002, 0.0035, 2)
	require.NoError(b, err)
	var strains []float64
	for i := range 35 {
		strains = append(strains, float64(i+1)*0.0001)
	}
	var solver Solver
	var points []CurvaturePoint
	for b.Loop() {
		if points, err = solver.MomentCurvature(points[:0], s, law, Bending{}, strains, 0); err != nil {
			b.Fatal(err)
		}
	}
}

func BenchmarkLaws(b *testing.B) {
	s, block, _ := beamOf(b, 2)
	strength := units.Megapascal.Of(30)
	parabola, err := ParabolaRectangle(strength, 0.002, 0.0035, 2)
	require.NoError(b, err)
	fitted, err := ParabolaRectangle(strength, 0.0023, 0.0029, 1.6)
	require.NoError(b, err)
	for _, l := range []struct {
		name string
		law  Law
	}{{"block", block}, {"parabola-rectangle", parabola}, {"fitted", fitted}} {
		b.Run(l.name, func(b *testing.B) {
			var solver Solver
			var u Ultimate
			for b.Loop() {
				if err := solver.Ultimate(&u, s, l.law, Bending{}); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
}

func BenchmarkFibres(b *testing.B) {
	s, law, _ := beamOf(b, 2)
	for b.Loop() {
		if _, err := s.Fibres(law, Bending{}); err != nil {
			b.Fatal(err)
		}
	}
}

func BenchmarkRequiredArea(b *testing.B) {
	s, law, _ := beamOf(b, 2)
	var solver Solver
	for b.Loop() {
		if _, err := solver.RequiredArea(s, 0, law, Bending{}, units.KilonewtonMetre.Of(600)); err != nil {
			b.Fatal(err)
		}
	}
}

func BenchmarkCracked(b *testing.B) {
	s, _, _ := beamOf(b, 2)
	for b.Loop() {
		if _, err := s.Cracked(8, Sagging); err != nil {
			b.Fatal(err)
		}
	}
}
