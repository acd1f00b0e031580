package mechanics_test

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

func TestRequiredTensionIsTheTextbookFormula(t *testing.T) {
	const width, d, demand = 12.0, 21.5, 3000.0 // in., in., kip-in
	steel := mechanics.Steel{Modulus: ksi(29000), Yield: ksi(60)}
	area, err := mechanics.RequiredTension(in(width), in(d), whitney(t, ksi(4), 0.85), steel, units.KipInch.Of(demand))
	require.NoError(t, err)
	// rho = (0.85 f'c/fy)(1 - √(1 - 2Rn/(0.85 f'c)))
	rn := demand / (width * d * d)
	rho := 3.4 / 60 * (1 - math.Sqrt(1-2*rn/3.4))
	require.InEpsilon(t, rho*width*d, area.In(units.SquareInch), exact)
}

// Steel put back gives the demand, for any law, and for steel that does not
// yield too.
func TestRequiredTensionPutBack(t *testing.T) {
	parabola, err := mechanics.ParabolaRectangle(mpa(25), 0.002, 0.0035, 2)
	require.NoError(t, err)
	laws := []mechanics.Law{whitney(t, mpa(30), 0.85), parabola}
	rapid.Check(t, func(t *rapid.T) {
		law := rapid.SampledFrom(laws).Draw(t, "law")
		width, d := rapid.Float64Range(150, 900).Draw(t, "width"), rapid.Float64Range(150, 1200).Draw(t, "depth")
		mean, lever := law.Resultant()
		most := mean.MulArea(mm(width).MulLength(mm(d))).MulLength(mm(d)).Scale(1 - lever)
		moment := most.Scale(rapid.Float64Range(0.001, 0.98).Draw(t, "share"))
		steel := mechanics.Steel{Modulus: mpa(200000), Yield: mpa(rapid.SampledFrom([]float64{280, 420, 690}).Draw(t, "yield"))}
		area, err := mechanics.RequiredTension(mm(width), mm(d), law, steel, moment)
		require.NoError(t, err)
		s := mechanics.Section{Parts: mechanics.Rectangle(mm(width), mm(d)), Layers: []mechanics.Layer{{Depth: mm(d), Area: area, Steel: steel}}}
		u, err := s.Ultimate(law, mechanics.Bending{})
		require.NoError(t, err)
		require.InEpsilon(t, moment.In(units.NewtonMetre), u.Nominal.In(units.NewtonMetre), 1e-9)

		var solver mechanics.Solver
		found, err := solver.RequiredArea(s, 0, law, mechanics.Bending{}, moment)
		if area.In(units.SquareMillimetre) < 0.99*width*d {
			require.NoError(t, err)
			require.InEpsilon(t, area.In(units.SquareMetre), found.In(units.SquareMetre), 1e-6)
		}
	})
}

func TestRequiredTensionUnreachable(t *testing.T) {
	law := whitney(t, ksi(4), 0.85)
	steel := mechanics.Steel{Modulus: ksi(29000), Yield: ksi(60)}
	most := 3.4 * 0.85 * 12 * 20 * 20 * (1 - 0.425)
	var unreachable *mechanics.UnreachableError
	_, err := mechanics.RequiredTension(in(12), in(20), law, steel, units.KipInch.Of(most*1.0001))
	require.ErrorAs(t, err, &unreachable)
	require.InEpsilon(t, most, unreachable.Greatest.In(units.KipInch), exact)
	require.ErrorContains(t, err, "no area of steel")
	_, err = mechanics.RequiredTension(in(12), in(20), law, steel, units.KipInch.Of(most*0.9999))
	require.NoError(t, err)
	_, err = mechanics.RequiredTension(in(12), in(20), law, steel, units.KipInch.Of(1e9))
	require.ErrorAs(t, err, &unreachable)

	var input *mechanics.InputError
	for field, call := range map[string]func() error{
		"moment": func() error {
			_, err := mechanics.RequiredTension(in(12), in(20), law, steel, units.Moment{})
			return err
		},
		"law": func() error {
			_, err := mechanics.RequiredTension(in(12), in(20), mechanics.Law{}, steel, units.KipInch.Of(1))
			return err
		},
		"parts[0].width": func() error {
			_, err := mechanics.RequiredTension(in(-1), in(20), law, steel, units.KipInch.Of(1))
			return err
		},
	} {
		require.ErrorAs(t, call(), &input)
		require.Equal(t, field, input.Field)
	}
}

func TestRequiredAreaPutBack(t *testing.T) {
	law := whitney(t, mpa(30), 0.85)
	s := mechanics.Section{
		Parts:  mechanics.Tee(mm(900), mm(120), mm(300), mm(700)),
		Layers: []mechanics.Layer{layerSI(60, 600, 420), layerSI(640, 1, 420), layerSI(580, 800, 420)},
	}
	var solver mechanics.Solver
	moment := units.KilonewtonMetre.Of(900)
	area, err := solver.RequiredArea(s, 1, law, mechanics.Bending{}, moment)
	require.NoError(t, err)
	require.InEpsilon(t, 1, s.Layers[1].Area.In(units.SquareMillimetre), exact, "the caller's section is left alone")
	s.Layers[1].Area = area
	u := solve(t, s, law, mechanics.Bending{})
	require.InEpsilon(t, 900, u.Nominal.In(units.KilonewtonMetre), 1e-9)
	require.GreaterOrEqual(t, u.Nominal.In(units.KilonewtonMetre), 900.0)

	area, err = solver.RequiredArea(s, 1, law, mechanics.Bending{}, units.KilonewtonMetre.Of(100))
	require.NoError(t, err)
	require.True(t, area.IsZero(), "the other layers suffice")

	var unreachable *mechanics.UnreachableError
	_, err = solver.RequiredArea(s, 1, law, mechanics.Bending{}, units.KilonewtonMetre.Of(9000))
	require.ErrorAs(t, err, &unreachable)
	require.Greater(t, unreachable.Greatest.In(units.KilonewtonMetre), 900.0)
	var input *mechanics.InputError
	_, err = solver.RequiredArea(s, 3, law, mechanics.Bending{}, moment)
	require.ErrorAs(t, err, &input)
	require.Equal(t, "layer", input.Field)
}
