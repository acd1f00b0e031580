package mechanics_test

import (
	"fmt"
	"math"
	"math/rand/v2"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// TestTwoRoutesAgree holds the polynomial route against fibre integration on
// 100,000 random sections: the same equilibria in number, place and moment. The
// sections are invented, and many are such as nobody would build: tees either way
// up, boxes, tapering webs and stacks of up to five rectangles or trapezoids, up
// to eight layers of grades of their own anywhere in the depth, steel from a trace
// to a tenth of the concrete, both senses, some axial force.
func TestTwoRoutesAgree(t *testing.T) {
	const shards = 4
	sections := 100_000
	if testing.Short() {
		sections = 800
	}
	laws := randomLaws(t)
	for shard := range shards {
		t.Run(fmt.Sprint("shard ", shard), func(t *testing.T) {
			t.Parallel()
			rng := rand.New(rand.NewPCG(318, uint64(shard)))
			var solver mechanics.Solver
			var u mechanics.Ultimate
			var solved, several int
			var worst float64
			for i := range sections / shards {
				s, bending := randomSection(rng)
				law := laws[rng.IntN(len(laws))]
				err := solver.Ultimate(&u, s, law, bending)
				f, fibreErr := s.Fibres(law, bending)
				if err != nil || fibreErr != nil {
					var none *mechanics.NoEquilibriumError
					require.ErrorAs(t, err, &none, "section %d: %+v", i, s)
					require.ErrorAs(t, fibreErr, &none, "section %d: %+v", i, s)
					continue
				}
				difference := compareRoutes(&u, &f, s.Depth())
				if difference > 1e-9 {
					require.LessOrEqual(t, difference, 1e-9, "section %d %+v, %+v:\n%+v\n%+v", i, s, bending, u, f)
				}
				worst = math.Max(worst, difference)
				solved++
				if u.Equilibria > 1 {
					several++
				}
			}
			require.Greater(t, solved, sections/shards*9/10)
			require.True(t, several > 0 || testing.Short(), "no section with several equilibria")
			t.Logf("%d sections, %d with several equilibria, worst difference %.1e", solved, several, worst)
		})
	}
}

// compareRoutes returns the greatest relative difference, and infinity where the
// equilibria differ in number.
func compareRoutes(u *mechanics.Ultimate, f *mechanics.FibreUltimate, depth units.Length) float64 {
	if u.Equilibria != f.Equilibria || len(u.Others) != len(f.Others) {
		return math.Inf(1)
	}
	worst := math.Abs(u.NeutralAxis.Ratio(f.NeutralAxis) - 1)
	for i := range u.Others {
		worst = math.Max(worst, math.Abs(u.Others[i].Ratio(f.Others[i])-1))
	}
	// Of the moment, and no less than of a tenth of the depth times the
	// compression: an axial force can leave next to no moment.
	scale := u.Nominal.Abs().Max(u.Concrete.MulLength(depth).Scale(0.1))
	return math.Max(worst, f.Nominal.Sub(u.Nominal).Abs().Ratio(scale))
}

// randomLaws returns blocks of the usual strengths for most of the draws, and
// other laws for the rest.
func randomLaws(t *testing.T) []mechanics.Law {
	t.Helper()
	var laws []mechanics.Law
	add := func(law mechanics.Law, err error) {
		require.NoError(t, err)
		laws = append(laws, law)
	}
	for _, strength := range []float64{20, 25, 30, 35, 45, 60} {
		for _, beta1 := range []float64{0.65, 0.75, 0.8, 0.85} {
			add(mechanics.RectangularBlock(mpa(0.85*strength), beta1, 0.003))
		}
	}
	add(mechanics.RectangularBlock(mpa(20), 0.8, 0.0035))
	add(mechanics.ParabolaRectangle(mpa(17), 0.002, 0.0035, 2))
	add(mechanics.ParabolaRectangle(mpa(33), 0.0022, 0.0031, 2))
	add(mechanics.Bilinear(mpa(20), 0.00175, 0.0035))
	add(mechanics.Polyline(mechanics.Point{}, mechanics.Point{Strain: 0.002, Stress: mpa(28)}, mechanics.Point{Strain: 0.0038, Stress: mpa(24)}))
	add(mechanics.Polyline(mechanics.Point{Strain: 0.0005, Stress: mpa(12)}, mechanics.Point{Strain: 0.001, Stress: mpa(30)}, mechanics.Point{Strain: 0.004, Stress: mpa(10)}))
	return laws
}

func randomSection(rng *rand.Rand) (mechanics.Section, mechanics.Bending) {
	between := func(low, high float64) float64 { return low + (high-low)*rng.Float64() }
	var s mechanics.Section
	depth := between(150, 1500)
	width := between(100, 600)
	switch kind := rng.IntN(20); {
	case kind < 3:
		s.Parts = mechanics.Rectangle(mm(width), mm(depth))
	case kind < 6:
		s.Parts = mechanics.Tee(mm(width*between(1, 6)), mm(depth*between(0.05, 0.5)), mm(width), mm(depth))
	case kind < 9:
		s.Parts = mechanics.InvertedTee(mm(width*between(1, 6)), mm(depth*between(0.05, 0.5)), mm(width), mm(depth))
	case kind < 11:
		s.Parts = mechanics.Box(mm(width*between(1, 6)), mm(depth), mm(depth*between(0.05, 0.4)), mm(depth*between(0.05, 0.4)), mm(width*between(0.3, 1)))
	case kind < 13:
		s.Parts = mechanics.Trapezoid(mm(width*between(0.2, 3)), mm(width*between(0.2, 3)), mm(depth))
	case kind < 15: // a flange on a web that tapers
		s.Parts = mechanics.Tee(mm(width*between(1, 6)), mm(depth*between(0.05, 0.5)), mm(width), mm(depth))
		s.Parts[1].BottomWidth = mm(width * between(0.3, 1.5))
	default: // a stack of rectangles, or of trapezoids, or a polygon
		n := 2 + rng.IntN(4)
		top, above := units.Length{}, mm(width*between(0.3, 3))
		for i := range n {
			p := mechanics.Part{Top: top, Bottom: mm(depth).Scale(float64(i+1) / float64(n)), Width: above}
			above = mm(width * between(0.3, 3))
			switch {
			case kind < 17:
				p.BottomWidth = mm(width * between(0.3, 3))
			case kind < 19:
				p.BottomWidth = above
			}
			s.Parts = append(s.Parts, p)
			top = p.Bottom
		}
	}
	var gross float64
	for _, p := range s.Parts {
		above, below := p.Widths()
		gross += above.Add(below).Scale(0.5).MulLength(p.Bottom.Sub(p.Top)).In(units.SquareMillimetre)
	}
	for range 1 + rng.IntN(8) {
		area := gross * math.Pow(10, between(-4.5, -1.6))
		yield := []float64{280, 420, 500, 550, 690}[rng.IntN(5)]
		s.Layers = append(s.Layers, layerSI(depth*between(0.02, 0.98), area, yield))
	}
	bending := mechanics.Bending{Sense: mechanics.Sense(rng.IntN(2)), Displaced: mechanics.Displaced(rng.IntN(8) / 7)}
	if rng.IntN(5) == 0 {
		bending.Axial = mpa(20).MulArea(mm2(gross)).Scale(between(-0.03, 0.6))
	}
	return s, bending
}

// Laws that are fitted have scores of pieces, so a few sections suffice.
func TestTwoRoutesAgreeOnFittedLaws(t *testing.T) {
	power, err := mechanics.ParabolaRectangle(mpa(45), 0.0023, 0.0029, 1.6)
	require.NoError(t, err)
	// E. Hognestad (1951): a parabola to 0.002, then a fall of 15 per cent.
	hognestad, err := mechanics.Curve(func(e float64) units.Stress {
		if x := e / 0.002; x < 1 {
			return mpa(28 * (2*x - x*x))
		}
		return mpa(28 * (1 - 0.15*(e-0.002)/0.0018))
	}, 0.0038, 0.002)
	require.NoError(t, err)
	rng := rand.New(rand.NewPCG(1992, 1))
	for range cases(30) {
		s, bending := randomSection(rng)
		bending.Axial = units.Force{}
		for _, law := range []mechanics.Law{power, hognestad} {
			u := solve(t, s, law, bending)
			f, err := s.Fibres(law, bending)
			require.NoError(t, err)
			require.LessOrEqual(t, compareRoutes(&u, &f, s.Depth()), 1e-9, "%+v %+v", s, bending)
		}
	}
}
