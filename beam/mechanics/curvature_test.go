package mechanics_test

import (
	"math"
	"math/rand/v2"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

func curve(t *testing.T, s mechanics.Section, law mechanics.Law, b mechanics.Bending, strains ...float64) []mechanics.CurvaturePoint {
	t.Helper()
	var solver mechanics.Solver
	points, err := solver.MomentCurvature(nil, s, law, b, strains, 0)
	require.NoError(t, err)
	require.Len(t, points, len(strains))
	for i, p := range points {
		require.Equal(t, strains[i], p.Strain)
		require.InEpsilon(t, p.Strain, p.NeutralAxis.In(units.Metre)*p.Curvature.In(units.PerMetre), exact)
	}
	return points
}

// Below its peak strain a bilinear law is elastic: the neutral axis is that of
// the cracked transformed section, and the moment its rigidity times the
// curvature.
func TestElasticCurveIsThatOfTheCrackedSection(t *testing.T) {
	const modulus = 25000.0 // MPa
	law, err := mechanics.Bilinear(mpa(50), 50/modulus, 0.0035)
	require.NoError(t, err)
	layers := []mechanics.Layer{layerSI(640, 3000, 5000), layerSI(560, 600, 5000), layerSI(60, 1200, 5000)}
	parts := map[string][]mechanics.Part{
		"rectangle":    mechanics.Rectangle(mm(300), mm(700)),
		"tee":          mechanics.Tee(mm(900), mm(110), mm(300), mm(700)),
		"inverted tee": mechanics.InvertedTee(mm(900), mm(110), mm(300), mm(700)),
		"trapezoid":    mechanics.Trapezoid(mm(500), mm(250), mm(700)),
		"box":          mechanics.Box(mm(900), mm(700), mm(120), mm(150), mm(260)),
	}
	for name, p := range parts {
		for _, sense := range []mechanics.Sense{mechanics.Sagging, mechanics.Hogging} {
			t.Run(name+" "+sense.String(), func(t *testing.T) {
				s := mechanics.Section{Parts: p, Layers: layers}
				cracked, err := s.Cracked(200000/modulus, sense)
				require.NoError(t, err)
				for _, p := range curve(t, s, law, mechanics.Bending{Sense: sense}, 1e-6, 0.0004, 0.0011, 0.0019) {
					require.InEpsilon(t, cracked.NeutralAxis.In(units.Metre), p.NeutralAxis.In(units.Metre), 1e-11)
					rigidity := mpa(modulus).MulSecondMoment(cracked.SecondMoment)
					require.InEpsilon(t, rigidity.MulCurvature(p.Curvature).In(units.NewtonMetre), p.Moment.In(units.NewtonMetre), 1e-11)
				}
			})
		}
	}
}

// Up to its peak the parabola has the mean stress f·(x - x²/3) at a depth of
// (1/3 - x/12)/(1 - x/3) of the neutral axis, x being the strain over the peak
// strain: integrated by hand.
func TestCurveUnderAParabolaIsExact(t *testing.T) {
	law, err := mechanics.ParabolaRectangle(mpa(20), 0.002, 0.0035, 2)
	require.NoError(t, err)
	const width, d, area, yield = 300.0, 500.0, 900.0, 435.0
	s := mechanics.Section{Parts: mechanics.Rectangle(mm(width), mm(550)), Layers: []mechanics.Layer{layerSI(d, area, yield)}}
	for _, p := range curve(t, s, law, mechanics.Bending{}, 0.0012, 0.0016, 0.002) {
		x := p.Strain / 0.002
		mean, lever := 20*(x-x*x/3), (1.0/3-x/12)/(1-x/3)
		c := area * yield / (mean * width)
		require.Greater(t, p.ExtremeStrain, 0.0022, "the case is what it says")
		require.InEpsilon(t, c, p.NeutralAxis.In(units.Millimetre), exact)
		require.InEpsilon(t, area*yield*(d-lever*c), p.Moment.In(units.NewtonMillimetre), exact)
		require.InEpsilon(t, p.Strain*(d-c)/c, p.ExtremeStrain, exact)
		require.Equal(t, 1, p.Equilibria)
	}
}

func TestCurveEndsAtTheUltimate(t *testing.T) {
	rng := rand.New(rand.NewPCG(5, 8))
	laws := randomLaws(t)
	var solver mechanics.Solver
	for range cases(300) {
		s, bending := randomSection(rng)
		law := laws[rng.IntN(len(laws))]
		u, err := s.Ultimate(law, bending)
		if err != nil {
			continue
		}
		points, err := solver.MomentCurvature(nil, s, law, bending, []float64{law.Ultimate()}, 0)
		require.NoError(t, err)
		require.Equal(t, []mechanics.CurvaturePoint{{
			Strain: law.Ultimate(), NeutralAxis: u.NeutralAxis, Curvature: u.Curvature, Moment: u.Nominal,
			ExtremeStrain: u.ExtremeStrain, Equilibria: u.Equilibria,
		}}, points)
	}
}

// At a strain below the ultimate the fibres of the truncated law find the same
// equilibria, and the fibres ask nothing of a law but its stresses.
func TestTwoRoutesAgreeAlongTheCurve(t *testing.T) {
	rng := rand.New(rand.NewPCG(12, 34))
	laws := randomLaws(t)
	sections, solved := cases(4000), 0
	for range sections {
		s, bending := randomSection(rng)
		law := laws[rng.IntN(len(laws))]
		strain := law.Ultimate() * (0.4 + 0.6*rng.Float64())
		cut, err := law.Truncated(strain)
		require.NoError(t, err)
		u, err := s.Ultimate(cut, bending)
		f, fibreErr := s.Fibres(cut, bending)
		if err != nil || fibreErr != nil {
			require.Error(t, err)
			require.Error(t, fibreErr)
			continue
		}
		solved++
		require.LessOrEqual(t, compareRoutes(&u, &f, s.Depth()), 1e-9, "%+v %+v", s, bending)
	}
	require.Greater(t, solved, sections*7/8)
}

// The sections of a curve are sections of one beam: more strain of the
// compression face is more curvature, under a law that does not soften.
func TestCurvatureGrowsWithStrain(t *testing.T) {
	law, err := mechanics.ParabolaRectangle(mpa(25), 0.002, 0.0035, 2)
	require.NoError(t, err)
	var strains []float64
	for i := range 70 {
		strains = append(strains, 0.00005*float64(i+1))
	}
	rng := rand.New(rand.NewPCG(7, 7))
	for range cases(300) {
		s, bending := randomSection(rng)
		bending.Axial = units.Force{}
		points := curve(t, s, law, bending, strains...)
		for i := range points[1:] {
			require.True(t, points[i].Curvature.Less(points[i+1].Curvature), "%v to %v", points[i], points[i+1])
		}
	}
}

// The reinforcement breaks at a strain between two points: the curve ends there.
func TestCurveEndsWhereTheSteelBreaks(t *testing.T) {
	law, err := mechanics.ParabolaRectangle(mpa(20), 0.002, 0.0035, 2)
	require.NoError(t, err)
	s := mechanics.Section{Parts: mechanics.Rectangle(mm(300), mm(550)), Layers: []mechanics.Layer{layerSI(500, 400, 435)}}
	strains := []float64{0.0005, 0.001, 0.0015, 0.002, 0.0025, 0.003, 0.0035}
	const breaking = 0.02
	var solver mechanics.Solver
	all, err := solver.MomentCurvature(nil, s, law, mechanics.Bending{}, strains, 0)
	require.NoError(t, err)
	require.Len(t, all, len(strains))
	require.Greater(t, all[6].ExtremeStrain, breaking)
	some, err := solver.MomentCurvature(nil, s, law, mechanics.Bending{}, strains, breaking)
	require.NoError(t, err)
	n := len(some) - 1
	require.Greater(t, n, 1)
	require.Equal(t, all[:n], some[:n])
	require.InEpsilon(t, breaking, some[n].ExtremeStrain, 1e-12)
	require.LessOrEqual(t, some[n].ExtremeStrain, breaking)
	require.Greater(t, all[n].ExtremeStrain, breaking)
	require.Greater(t, some[n].Strain, all[n-1].Strain)
	require.Less(t, some[n].Strain, all[n].Strain)
	at := curve(t, s, law, mechanics.Bending{}, some[n].Strain)
	require.Equal(t, at[0], some[n])

	// At the first strain already: the curve is that one point.
	one, err := solver.MomentCurvature(nil, s, law, mechanics.Bending{}, strains[6:], breaking)
	require.NoError(t, err)
	require.Equal(t, some[n:], one)
	// A strain that the ultimate just reaches breaks nothing.
	whole, err := solver.MomentCurvature(nil, s, law, mechanics.Bending{}, strains, all[6].ExtremeStrain)
	require.NoError(t, err)
	require.Equal(t, all, whole)
	// Under a block stress begins at a strain, where hardly any is in the steel.
	block := whitney(t, mpa(30), 0.85)
	few, err := solver.MomentCurvature(nil, s, block, mechanics.Bending{}, []float64{0.003}, 1e-6)
	require.NoError(t, err)
	require.Len(t, few, 1)
	require.InEpsilon(t, 1e-6, few[0].ExtremeStrain, 1e-6)
	// A tension of half the yield force strains the steel by 0.001 before any
	// bending: steel that breaks before leaves no point, later a few.
	pull := mechanics.Bending{Axial: units.Newton.Of(-400 * 435 / 2.0)}
	none, err := solver.MomentCurvature(nil, s, law, pull, strains, 0.001)
	require.NoError(t, err)
	require.Empty(t, none)
	few, err = solver.MomentCurvature(nil, s, law, pull, strains, 0.003)
	require.NoError(t, err)
	require.NotEmpty(t, few)
}

func TestAtCurvature(t *testing.T) {
	law, err := mechanics.ParabolaRectangle(mpa(25), 0.002, 0.0035, 2)
	require.NoError(t, err)
	var solver mechanics.Solver
	rng := rand.New(rand.NewPCG(3, 9))
	for range cases(200) {
		s, bending := randomSection(rng)
		bending.Axial = bending.Axial.Max(units.Force{}).Scale(0.3)
		strain := 0.0035 * (0.3 + 0.7*rng.Float64())
		points, err := solver.MomentCurvature(nil, s, law, bending, []float64{strain}, 0)
		if err != nil {
			continue
		}
		p, err := solver.AtCurvature(s, law, bending, points[0].Curvature)
		require.NoError(t, err)
		require.InEpsilon(t, points[0].Curvature.In(units.PerMetre), p.Curvature.In(units.PerMetre), 1e-12)
		require.InEpsilon(t, strain, p.Strain, 1e-9)
		require.InDelta(t, 1, p.Moment.Ratio(points[0].Moment), 1e-8)
	}

	s := mechanics.Section{Parts: mechanics.Rectangle(mm(300), mm(550)), Layers: []mechanics.Layer{layerSI(500, 1500, 435)}}
	u := solve(t, s, law, mechanics.Bending{})
	end, err := solver.AtCurvature(s, law, mechanics.Bending{}, u.Curvature)
	require.NoError(t, err)
	require.Equal(t, law.Ultimate(), end.Strain)
	require.Equal(t, u.Nominal, end.Moment)
	small, err := solver.AtCurvature(s, law, mechanics.Bending{}, u.Curvature.Scale(1e-5))
	require.NoError(t, err)
	require.InEpsilon(t, 1e-5, small.Curvature.Ratio(u.Curvature), 1e-12)
	require.Positive(t, small.Moment.In(units.NewtonMetre))

	var input *mechanics.InputError
	for _, curvature := range []units.Curvature{{}, u.Curvature.Neg(), u.Curvature.Scale(1e-7), u.Curvature.Scale(1.0001), u.Curvature.Scale(math.NaN())} {
		_, err := solver.AtCurvature(s, law, mechanics.Bending{}, curvature)
		require.ErrorAs(t, err, &input)
		require.Equal(t, "curvature", input.Field)
		require.Contains(t, input.Allowed, u.Curvature.String())
		require.Equal(t, curvature.String(), input.Value)
	}
	_, err = solver.AtCurvature(s, mechanics.Law{}, mechanics.Bending{}, u.Curvature)
	require.ErrorAs(t, err, &input)
	require.Equal(t, "law", input.Field)
}

func TestMomentCurvatureRefuses(t *testing.T) {
	law := whitney(t, mpa(30), 0.85)
	s := mechanics.Section{Parts: mechanics.Rectangle(mm(300), mm(550)), Layers: []mechanics.Layer{layerSI(500, 1500, 435)}}
	axial := mechanics.Bending{Axial: units.Kilonewton.Of(2500)}
	var solver mechanics.Solver
	kept := []mechanics.CurvaturePoint{{Strain: 7}}
	for _, test := range []struct {
		name, field, allowed string
		law                  mechanics.Law
		strains              []float64
		breaking             float64
		points               int
	}{
		{"no law", "law", "RectangularBlock", mechanics.Law{}, []float64{0.001}, 0, 0},
		{"beyond the law", "strains[1]", "to 0.003", law, []float64{0.001, 0.0031}, 0, 1},
		{"far too small", "strains[0]", "from 3e-07", law, []float64{2e-7}, 0, 0},
		{"no stress yet", "strains[0]", "stress begins", law, []float64{0.0004}, 0, 0},
		{"not a number", "strains[1]", "to 0.003", law, []float64{0.001, math.NaN()}, 0, 1},
		{"not increasing", "strains[2]", "above the one before it, 0.002", law, []float64{0.001, 0.002, 0.002}, 0, 2},
		{"negative breaking strain", "breaking strain", "from 1e-06 to 1", law, []float64{0.001}, -0.01, 0},
		{"great breaking strain", "breaking strain", "from 1e-06 to 1", law, []float64{0.001}, 1.1, 0},
	} {
		t.Run(test.name, func(t *testing.T) {
			points, err := solver.MomentCurvature(kept, s, test.law, mechanics.Bending{}, test.strains, test.breaking)
			var input *mechanics.InputError
			require.ErrorAs(t, err, &input)
			require.Equal(t, test.field, input.Field)
			require.Contains(t, input.Allowed, test.allowed)
			require.NotEmpty(t, input.Value)
			require.Len(t, points, 1+test.points)
			require.Equal(t, kept[0], points[0])
		})
	}
	var none *mechanics.NoEquilibriumError
	weak, err := mechanics.Bilinear(mpa(30), 0.002, 0.003)
	require.NoError(t, err)
	_, err = solver.MomentCurvature(nil, s, weak, axial, []float64{0.0005, 0.003}, 0)
	require.ErrorAs(t, err, &none)
	require.ErrorContains(t, err, "strains[0]")
	points, err := solver.MomentCurvature(nil, s, weak, axial, []float64{0.003}, 0)
	require.NoError(t, err)
	require.Len(t, points, 1)
	// The smaller strains that the halving passes cannot balance the force.
	p, err := solver.AtCurvature(s, weak, axial, points[0].Curvature.Scale(0.9))
	require.NoError(t, err)
	require.InEpsilon(t, 0.9, p.Curvature.Ratio(points[0].Curvature), 1e-12)
	var input *mechanics.InputError
	s.Layers[0].Area = units.Area{}
	_, err = solver.MomentCurvature(nil, s, law, mechanics.Bending{}, []float64{0.001}, 0)
	require.ErrorAs(t, err, &input)
	require.Equal(t, "layers[0].area", input.Field)
}

func TestTruncatedLaw(t *testing.T) {
	parabola, err := mechanics.ParabolaRectangle(mpa(25), 0.002, 0.0035, 2)
	require.NoError(t, err)
	line, err := mechanics.Polyline(mechanics.Point{Strain: 0.0005, Stress: mpa(12)}, mechanics.Point{Strain: 0.001, Stress: mpa(30)}, mechanics.Point{Strain: 0.004, Stress: mpa(10)})
	require.NoError(t, err)
	for _, law := range []mechanics.Law{whitney(t, mpa(30), 0.85), parabola, line} {
		for _, share := range []float64{0.3, 0.55, 0.9, 1} {
			cut, err := law.Truncated(share * law.Ultimate())
			require.NoError(t, err)
			require.InEpsilon(t, share*law.Ultimate(), cut.Ultimate(), exact)
			for i := range 100 {
				strain := cut.Ultimate() * (float64(i) + 0.5) / 100
				require.InDelta(t, law.Stress(strain).In(units.Pascal), cut.Stress(strain).In(units.Pascal), 1e-6)
			}
			require.True(t, cut.Stress(cut.Ultimate()*1.001).IsZero())
		}
		same, err := law.Truncated(law.Ultimate())
		require.NoError(t, err)
		require.Equal(t, law, same)
	}
	// At a kink the piece beyond is gone.
	cut, err := parabola.Truncated(0.002)
	require.NoError(t, err)
	require.Equal(t, []float64{0}, cut.Kinks())
	mean, depth := cut.Resultant()
	require.InEpsilon(t, 25*2.0/3, mean.In(units.Megapascal), exact)
	require.InEpsilon(t, 3.0/8, depth, exact)

	var input *mechanics.InputError
	for _, strain := range []float64{0, -1, math.NaN(), 0.0036, 3e-7} {
		_, err := parabola.Truncated(strain)
		require.ErrorAs(t, err, &input)
		require.Equal(t, "strain", input.Field)
	}
	none, err := line.Truncated(0.0005)
	require.Equal(t, mechanics.Law{}, none)
	require.ErrorAs(t, err, &input)
	require.Equal(t, "strain", input.Field)
	require.Contains(t, input.Allowed, "stress begins")
	_, err = mechanics.Law{}.Truncated(0.001)
	require.ErrorAs(t, err, &input)
	require.Equal(t, "law", input.Field)
}

// Where the edge of a block passes a bar the least depth of the neutral axis can
// leap, and the line doubles back: the point found has the curvature all the same.
func TestAtCurvatureWhereTheLineDoublesBack(t *testing.T) {
	law := whitney(t, mpa(30), 0.85)
	s := mechanics.Section{
		Parts:  mechanics.Rectangle(mm(300), mm(600)),
		Layers: []mechanics.Layer{layerSI(540, 3200, 420), layerSI(100, 6000, 420)},
	}
	points := curve(t, s, law, mechanics.Bending{}, 0.001, 0.001024)
	require.True(t, points[1].Curvature.Less(points[0].Curvature.Scale(0.98)), "the case is what it says")
	var solver mechanics.Solver
	between := points[0].Curvature.Add(points[1].Curvature).Scale(0.5)
	p, err := solver.AtCurvature(s, law, mechanics.Bending{}, between)
	require.NoError(t, err)
	require.InEpsilon(t, between.In(units.PerMetre), p.Curvature.In(units.PerMetre), 1e-12)
}
