package mechanics_test

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"
	"gonum.org/v1/gonum/integrate/quad"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

func TestBlockStress(t *testing.T) {
	law := whitney(t, mpa(30), 0.8)
	require.InEpsilon(t, 0.003, law.Ultimate(), exact)
	for strain, want := range map[float64]float64{-0.001: 0, 0: 0, 0.0005: 0, 0.00061: 25.5, 0.003: 25.5, 0.0031: 0} {
		require.InDelta(t, want, law.Stress(strain).In(units.Megapascal), 1e-9, "strain %v", strain)
	}
	require.Len(t, law.Kinks(), 1)
	require.InEpsilon(t, 0.0006, law.Kinks()[0], exact)
	mean, depth := law.Resultant()
	require.InEpsilon(t, 0.8*25.5, mean.In(units.Megapascal), exact)
	require.InEpsilon(t, 0.4, depth, exact)
}

// Table 3.1 of EN 1992-1-1:2004 gives exponents below 2 for concrete above
// C50/60; those laws are fitted. The formula and its integrals, by Gauss and
// Legendre on each side of the peak, are the measure.
func TestParabolaRectangleFollowsItsFormula(t *testing.T) {
	for _, exponent := range []float64{1, 1.4, 1.45, 1.6, 1.75, 2, 2.3, 3} {
		const f, peak, ultimate = 40.0, 0.0024, 0.0029
		law, err := mechanics.ParabolaRectangle(mpa(f), peak, ultimate, exponent)
		require.NoError(t, err)
		formula := func(e float64) float64 {
			if e >= peak {
				return f
			}
			return f * (1 - math.Pow(1-e/peak, exponent))
		}
		for i := range 4001 {
			e := ultimate * float64(i) / 4000
			require.InDelta(t, formula(e), law.Stress(e).In(units.Megapascal), 2e-9*f, "exponent %v, strain %v", exponent, e)
		}
		// Closed forms of ∫(1-x)ⁿ.
		p := peak / ultimate
		mean := f * (1 - p/(exponent+1))
		moment := f * (0.5 - p/(exponent+1)*(1-p/(exponent+2)))
		got, depth := law.Resultant()
		require.InEpsilon(t, mean, got.In(units.Megapascal), 1e-9)
		require.InEpsilon(t, moment/mean, depth, 1e-9)
	}
}

func TestCurveFollowsItsFunction(t *testing.T) {
	// The nonlinear law of EN 1992-1-1:2004 3.1.5(1), expression (3.14), for
	// C30/37: fcm = 38 MPa, peak 0.0022, k = 1.05·33000·0.0022/38.
	const fcm, peak, ultimate, k = 38.0, 0.0022, 0.0035, 1.05 * 33000 * 0.0022 / 38
	f := func(e float64) float64 {
		x := e / peak
		return fcm * (k*x - x*x) / (1 + (k-2)*x)
	}
	law, err := mechanics.Curve(func(e float64) units.Stress { return mpa(f(e)) }, ultimate)
	require.NoError(t, err)
	for i := range 4001 {
		e := ultimate * float64(i) / 4000
		require.InDelta(t, f(e), law.Stress(e).In(units.Megapascal), 1.5e-9*fcm)
	}
	mean, depth := law.Resultant()
	force := quad.Fixed(f, 0, ultimate, 60, nil, 0) / ultimate
	moment := quad.Fixed(func(e float64) float64 { return f(e) * (1 - e/ultimate) }, 0, ultimate, 60, nil, 0) / ultimate
	require.InEpsilon(t, force, mean.In(units.Megapascal), 1e-9)
	require.InEpsilon(t, moment/force, depth, 1e-9)
}

// A jump listed as a kink belongs to the greater strains, and a block drawn as a
// curve is that block.
func TestCurveMayJumpAtAKink(t *testing.T) {
	curve, err := mechanics.Curve(func(e float64) units.Stress {
		if e < 0.0006 {
			return units.Stress{}
		}
		return mpa(25.5)
	}, 0.003, 0.0006)
	require.NoError(t, err)
	s := mechanics.Section{
		Parts:  mechanics.Rectangle(mm(300), mm(600)),
		Layers: []mechanics.Layer{layerSI(540, 2000, 420), layerSI(60, 1000, 420)},
	}
	want := solve(t, s, whitney(t, mpa(30), 0.8), mechanics.Bending{})
	got := solve(t, s, curve, mechanics.Bending{})
	require.InEpsilon(t, want.Nominal.In(units.NewtonMetre), got.Nominal.In(units.NewtonMetre), 1e-9)
}

func TestCurveTooRough(t *testing.T) {
	_, err := mechanics.Curve(func(e float64) units.Stress {
		if e < 0.0011 {
			return mpa(1)
		}
		return mpa(2)
	}, 0.003)
	require.ErrorContains(t, err, "list its kinks and jumps")
}

func TestLawsRefuse(t *testing.T) {
	law := func(_ mechanics.Law, err error) error { return err }
	point := func(strain, stress float64) mechanics.Point {
		return mechanics.Point{Strain: strain, Stress: mpa(stress)}
	}
	constant := func(v float64) func(float64) units.Stress {
		return func(float64) units.Stress { return mpa(v) }
	}
	nan, inf := math.NaN(), math.Inf(1)
	tests := []struct {
		name, field string
		err         error
	}{
		{"zero intensity", "intensity", law(mechanics.RectangularBlock(mpa(0), 0.8, 0.003))},
		{"negative intensity", "intensity", law(mechanics.RectangularBlock(mpa(-20), 0.8, 0.003))},
		{"NaN intensity", "intensity", law(mechanics.RectangularBlock(mpa(nan), 0.8, 0.003))},
		{"factor above one", "depth factor", law(mechanics.RectangularBlock(mpa(20), 1.01, 0.003))},
		{"no factor", "depth factor", law(mechanics.RectangularBlock(mpa(20), 0, 0.003))},
		{"no ultimate strain", "ultimate strain", law(mechanics.RectangularBlock(mpa(20), 0.8, 0))},
		{"strain in percent", "ultimate strain", law(mechanics.RectangularBlock(mpa(20), 0.8, 0.3))},
		{"peak beyond ultimate", "peak strain", law(mechanics.ParabolaRectangle(mpa(20), 0.004, 0.0035, 2))},
		{"exponent below one", "exponent", law(mechanics.ParabolaRectangle(mpa(20), 0.002, 0.0035, 0.5))},
		{"infinite strength", "strength", law(mechanics.Bilinear(mpa(inf), 0.002, 0.0035))},
		{"one point", "points", law(mechanics.Polyline(point(0, 1)))},
		{"strains fall", "points[2].strain", law(mechanics.Polyline(point(0, 0), point(0.002, 20), point(0.001, 20)))},
		{"strain repeated", "points[1].strain", law(mechanics.Polyline(point(0.001, 0), point(0.001, 20), point(0.003, 20)))},
		{"tension", "points[0].strain", law(mechanics.Polyline(point(-0.001, 0), point(0.003, 20)))},
		{"negative stress", "points[1].stress", law(mechanics.Polyline(point(0, 0), point(0.001, -1), point(0.003, 20)))},
		{"NaN strain", "points[1].strain", law(mechanics.Polyline(point(0, 0), point(nan, 1)))},
		{"all zero", "greatest stress", law(mechanics.Polyline(point(0, 0), point(0.003, 0)))},
		{"curve of zero", "greatest stress", law(mechanics.Curve(constant(0), 0.003))},
		{"curve of NaN", "stress at 0 of the ultimate strain", law(mechanics.Curve(constant(nan), 0.003))},
		{"kink beyond ultimate", "kinks[0]", law(mechanics.Curve(constant(1), 0.003, 0.003))},
	}
	for _, test := range tests {
		t.Run(test.name, func(t *testing.T) {
			var input *mechanics.InputError
			require.ErrorAs(t, test.err, &input)
			require.Equal(t, test.field, input.Field)
			require.NotEmpty(t, input.Allowed)
			require.Contains(t, input.Error(), input.Value)
		})
	}
}
