package mechanics_test

import (
	"math"
	"math/rand/v2"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

var grade60 = mechanics.Steel{Modulus: ksi(29000), Yield: ksi(60)}

// The tee of any textbook: the overhangs and the web apart, in kips and inches.
func TestRequiredTensionOfATee(t *testing.T) {
	const bf, hf, bw, h, d = 30.0, 4.0, 12.0, 28.0, 25.0
	law := whitney(t, ksi(3), 0.85)
	layer := mechanics.Layer{Depth: in(d), Steel: grade60}
	upsideDown := mechanics.Layer{Depth: in(h - d), Steel: grade60}
	singly := func(b, moment float64) (area, a float64) {
		a = d - math.Sqrt(d*d-2*moment/(2.55*b))
		return 2.55 * b * a / 60, a
	}
	flange := 2.55 * (bf - bw) * hf
	for _, moment := range []float64{1500, 5200, 6500, 8000} { // kip-in
		want, a := singly(bf, moment)
		if a > hf {
			web, _ := singly(bw, moment-flange*(d-hf/2))
			want = flange/60 + web
		}
		var solver mechanics.Solver
		got, err := solver.RequiredTension(mechanics.Tee(in(bf), in(hf), in(bw), in(h)), law, mechanics.Bending{}, layer, units.KipInch.Of(moment))
		require.NoError(t, err)
		require.InEpsilon(t, want, got.In(units.SquareInch), exact)
		got, err = solver.RequiredTension(mechanics.InvertedTee(in(bf), in(hf), in(bw), in(h)), law, mechanics.Bending{Sense: mechanics.Hogging}, upsideDown, units.KipInch.Of(moment))
		require.NoError(t, err)
		require.InEpsilon(t, want, got.In(units.SquareInch), exact)
	}
}

// On a rectangle the method is the function.
func TestRequiredTensionOfARectangle(t *testing.T) {
	laws := randomLaws(t)
	rng := rand.New(rand.NewPCG(1, 2))
	var solver mechanics.Solver
	for range cases(500) {
		law := laws[rng.IntN(len(laws))]
		width, d := mm(150+600*rng.Float64()), mm(200+900*rng.Float64())
		mean, lever := law.Resultant()
		moment := mean.MulArea(width.MulLength(d)).MulLength(d).Scale((1 - lever) * 0.97 * rng.Float64())
		want, err := mechanics.RequiredTension(width, d, law, grade60, moment)
		require.NoError(t, err)
		parts := mechanics.Rectangle(width, d.Scale(1.1))
		got, err := solver.RequiredTension(parts, law, mechanics.Bending{}, mechanics.Layer{Depth: d, Steel: grade60}, moment)
		require.NoError(t, err)
		require.InEpsilon(t, want.In(units.SquareMetre), got.In(units.SquareMetre), exact)
	}
}

// Of any shape the steel put back gives the moment, and less does not.
func TestRequiredTensionPutBackInAnyShape(t *testing.T) {
	laws := randomLaws(t)
	rng := rand.New(rand.NewPCG(11, 9))
	var solver mechanics.Solver
	reached := 0
	for range cases(5000) {
		s, bending := randomSection(rng)
		law := laws[rng.IntN(len(laws))]
		bending.Axial = bending.Axial.Scale(0.2)
		layer := s.Layers[0]
		layer.Depth = s.Depth().Scale(0.94)
		if bending.Sense == mechanics.Hogging {
			layer.Depth = s.Depth().Scale(0.06)
		}
		gross, err := mechanics.Section{Parts: s.Parts}.Gross()
		require.NoError(t, err)
		moment := mpa(20).MulArea(gross.Area).MulLength(s.Depth()).Scale(0.3 * rng.Float64())
		area, err := solver.RequiredTension(s.Parts, law, bending, layer, moment)
		if err != nil {
			var unreachable *mechanics.UnreachableError
			require.ErrorAs(t, err, &unreachable)
			require.Equal(t, moment, unreachable.Moment)
			require.True(t, unreachable.Greatest.Less(moment))
			continue
		}
		if area.IsZero() {
			require.True(t, units.Force{}.Less(bending.Axial))
			continue
		}
		reached++
		layer.Area = area
		s.Layers = []mechanics.Layer{layer}
		u := solve(t, s, law, bending)
		scale := moment.Max(u.Concrete.MulLength(s.Depth()).Scale(0.01))
		require.InDelta(t, 0, u.Nominal.Sub(moment).Ratio(scale), 1e-9, "%+v %+v", s, bending)
		require.InDelta(t, 0, u.Residual.Ratio(u.Concrete), 1e-9)
	}
	require.Greater(t, reached, cases(3000))
}

// The general search of one layer comes to the same area.
func TestRequiredAreaOfATaperingWeb(t *testing.T) {
	law := whitney(t, mpa(30), 0.85)
	var solver mechanics.Solver
	for _, sense := range []mechanics.Sense{mechanics.Sagging, mechanics.Hogging} {
		parts := mechanics.Tee(mm(900), mm(120), mm(350), mm(700))
		parts[1].BottomWidth = mm(250)
		layer := layerSI(640, 1, 420)
		if sense == mechanics.Hogging {
			layer.Depth = mm(60)
		}
		bending, moment := mechanics.Bending{Sense: sense}, units.KilonewtonMetre.Of(700)
		want, err := solver.RequiredTension(parts, law, bending, layer, moment)
		require.NoError(t, err)
		s := mechanics.Section{Parts: parts, Layers: []mechanics.Layer{layer}}
		got, err := solver.RequiredArea(s, 0, law, bending, moment)
		require.NoError(t, err)
		require.InEpsilon(t, want.In(units.SquareMetre), got.In(units.SquareMetre), 1e-9)
	}
}

// With enough axial force the section has the moment without any steel.
func TestRequiredTensionUnderAxialForce(t *testing.T) {
	law := whitney(t, ksi(4), 0.85)
	parts := mechanics.Rectangle(in(12), in(24))
	layer := mechanics.Layer{Depth: in(21.5), Steel: grade60}
	var solver mechanics.Solver
	// 100 kip: a = 100/40.8, and the concrete alone has 100·(12 - a/2).
	bending := mechanics.Bending{Axial: units.Kip.Of(100)}
	alone := 100 * (12 - 100/40.8/2)
	area, err := solver.RequiredTension(parts, law, bending, layer, units.KipInch.Of(alone*0.999))
	require.NoError(t, err)
	require.True(t, area.IsZero())
	area, err = solver.RequiredTension(parts, law, bending, layer, units.KipInch.Of(2000))
	require.NoError(t, err)
	// About the steel: 2000 + 100·9.5 = 40.8·a·(21.5 - a/2).
	a := 21.5 - math.Sqrt(21.5*21.5-2*2950/40.8)
	require.InEpsilon(t, (40.8*a-100)/60, area.In(units.SquareInch), exact)

	// A tension that pulls between the centroid and the steel.
	var input *mechanics.InputError
	pull := mechanics.Bending{Axial: units.Kip.Of(-100)}
	for _, moment := range []float64{1, 950} {
		_, err = solver.RequiredTension(parts, law, pull, layer, units.KipInch.Of(moment))
		require.ErrorAs(t, err, &input)
		require.Equal(t, "axial", input.Field)
		require.Equal(t, pull.Axial.String(), input.Value)
		require.Contains(t, input.Allowed, "above 0")
		_, _, err = solver.RequiredBoth(parts, law, pull, layer, mechanics.Layer{Depth: in(2.5), Steel: grade60}, 0.005, units.KipInch.Of(moment))
		require.ErrorAs(t, err, &input)
		require.Equal(t, "axial", input.Field)
	}
	area, err = solver.RequiredTension(parts, law, pull, layer, units.KipInch.Of(951))
	require.NoError(t, err)
	a = 21.5 - math.Sqrt(21.5*21.5-2*1/40.8)
	require.InEpsilon(t, (40.8*a+100)/60, area.In(units.SquareInch), 1e-9)
}

func TestRequiredTensionOfAShapeRefuses(t *testing.T) {
	law := whitney(t, ksi(4), 0.85)
	parts := mechanics.Rectangle(in(12), in(24))
	layer := mechanics.Layer{Depth: in(20), Steel: grade60}
	moment := units.KipInch.Of(1000)
	var solver mechanics.Solver
	var unreachable *mechanics.UnreachableError
	// With the neutral axis at the steel, in a rectangle and below a flange.
	most := 3.4 * 0.85 * 12 * 20 * 20 * (1 - 0.425)
	_, err := solver.RequiredTension(parts, law, mechanics.Bending{}, layer, units.KipInch.Of(most*1.0001))
	require.ErrorAs(t, err, &unreachable)
	require.InEpsilon(t, most, unreachable.Greatest.In(units.KipInch), exact)
	require.Equal(t, units.KipInch.Of(most*1.0001), unreachable.Moment)
	axial := mechanics.Bending{Axial: units.Kip.Of(10)}
	_, err = solver.RequiredTension(parts, law, axial, layer, units.KipInch.Of(most))
	require.ErrorAs(t, err, &unreachable)
	require.InEpsilon(t, most-10*(20-12), unreachable.Greatest.In(units.KipInch), exact)
	// So near to it that the steel would have to be larger than any.
	_, err = solver.RequiredTension(parts, law, mechanics.Bending{}, layer, units.KipInch.Of(most*(1-1e-15)))
	require.ErrorAs(t, err, &unreachable)
	_, err = solver.RequiredTension(parts, law, mechanics.Bending{}, layer, units.KipInch.Of(most*0.999))
	require.NoError(t, err)

	var input *mechanics.InputError
	for field, call := range map[string]func() error{
		"moment": func() error {
			_, err := solver.RequiredTension(parts, law, mechanics.Bending{}, layer, units.Moment{})
			return err
		},
		"law": func() error {
			_, err := solver.RequiredTension(parts, mechanics.Law{}, mechanics.Bending{}, layer, moment)
			return err
		},
		"parts": func() error {
			_, err := solver.RequiredTension(nil, law, mechanics.Bending{}, layer, moment)
			return err
		},
		"sense": func() error {
			_, err := solver.RequiredTension(parts, law, mechanics.Bending{Sense: 2}, layer, moment)
			return err
		},
		"layers[0].depth away from": func() error {
			_, err := solver.RequiredTension(parts, law, mechanics.Bending{}, mechanics.Layer{Steel: grade60}, moment)
			return err
		},
		"layers[0].depth": func() error {
			_, err := solver.RequiredTension(parts, law, mechanics.Bending{}, mechanics.Layer{Depth: in(25), Steel: grade60}, moment)
			return err
		},
	} {
		require.ErrorAs(t, call(), &input)
		name, allowed, _ := strings.Cut(field, " ")
		require.Equal(t, name, input.Field)
		require.Contains(t, input.Allowed, allowed)
	}
}

// The doubly reinforced rectangle of any textbook, in kips and inches: the
// neutral axis where the tension steel has the least strain, a couple of steel
// for what the concrete lacks.
func TestRequiredBothIsTheTextbookFormula(t *testing.T) {
	const b, d, dTop, strain = 14.0, 24.0, 2.5, 0.005
	law := whitney(t, ksi(4), 0.85)
	c := d * 0.003 / (0.003 + strain)
	concrete := 3.4 * b * 0.85 * c
	most := concrete * (d - 0.425*c)
	stress := math.Min(60, 87*(c-dTop)/c)
	parts := mechanics.Rectangle(in(b), in(27))
	tension, compression := mechanics.Layer{Depth: in(d), Steel: grade60}, mechanics.Layer{Depth: in(dTop), Steel: grade60}
	var solver mechanics.Solver
	for _, displaced := range []mechanics.Displaced{mechanics.Deduct, mechanics.Ignore} {
		bending := mechanics.Bending{Displaced: displaced}
		net := stress
		if displaced == mechanics.Deduct {
			net -= 3.4
		}
		moment := most * 1.3
		area, areaTop, err := solver.RequiredBoth(parts, law, bending, tension, compression, strain, units.KipInch.Of(moment))
		require.NoError(t, err)
		couple := (moment - most) / (d - dTop)
		require.InEpsilon(t, couple/net, areaTop.In(units.SquareInch), exact)
		require.InEpsilon(t, (concrete+couple)/60, area.In(units.SquareInch), exact)
		tension.Area, compression.Area = area, areaTop
		u := solve(t, mechanics.Section{Parts: parts, Layers: []mechanics.Layer{tension, compression}}, law, bending)
		require.InEpsilon(t, moment, u.Nominal.In(units.KipInch), 1e-11)
		require.InEpsilon(t, strain, u.ExtremeStrain, 1e-11)

		// Up to what the concrete can do, no compression steel.
		for _, share := range []float64{0.4, 1 - 1e-12} {
			area, areaTop, err = solver.RequiredBoth(parts, law, bending, tension, compression, strain, units.KipInch.Of(most*share))
			require.NoError(t, err)
			require.True(t, areaTop.IsZero())
			alone, err := mechanics.RequiredTension(in(b), in(d), law, grade60, units.KipInch.Of(most*share))
			require.NoError(t, err)
			require.InEpsilon(t, alone.In(units.SquareInch), area.In(units.SquareInch), exact)
		}
		_, areaTop, err = solver.RequiredBoth(parts, law, bending, tension, compression, strain, units.KipInch.Of(most*(1+1e-9)))
		require.NoError(t, err)
		require.InEpsilon(t, 1e-9*most/(d-dTop)/net, areaTop.In(units.SquareInch), 1e-5)
	}
}

// Of any shape, in either sense, both areas put back give the moment and the
// strain, in one of the section's equilibria.
func TestRequiredBothPutBackInAnyShape(t *testing.T) {
	laws := randomLaws(t)
	rng := rand.New(rand.NewPCG(21, 9))
	var solver mechanics.Solver
	var u mechanics.Ultimate
	doubly, single, others := 0, 0, 0
	for range cases(4000) {
		s, bending := randomSection(rng)
		law := laws[rng.IntN(len(laws))]
		bending.Axial = bending.Axial.Scale(0.1)
		far, near := s.Depth().Scale(0.93), s.Depth().Scale(0.02+0.15*rng.Float64())
		if bending.Sense == mechanics.Hogging {
			far, near = s.Depth().Sub(far), s.Depth().Sub(near)
		}
		tension := mechanics.Layer{Depth: far, Steel: s.Layers[0].Steel}
		compression := mechanics.Layer{Depth: near, Steel: s.Layers[len(s.Layers)-1].Steel}
		gross, err := mechanics.Section{Parts: s.Parts}.Gross()
		require.NoError(t, err)
		moment := mpa(20).MulArea(gross.Area).MulLength(s.Depth()).Scale(0.02 + 0.4*rng.Float64())
		strain := []float64{0.003, 0.004, 0.005, 0.0075}[rng.IntN(4)]
		area, added, err := solver.RequiredBoth(s.Parts, law, bending, tension, compression, strain, moment)
		if err != nil {
			var unreachable *mechanics.UnreachableError
			require.ErrorAs(t, err, &unreachable)
			require.True(t, unreachable.Greatest.Less(moment))
			continue
		}
		if area.IsZero() || area.In(units.SquareMetre) > 1e8 || added.In(units.SquareMillimetre) > 0 && added.In(units.SquareMillimetre) < 1e-6 {
			continue
		}
		tension.Area, compression.Area = area, added
		s.Layers = []mechanics.Layer{tension}
		if !added.IsZero() {
			s.Layers = append(s.Layers, compression)
		}
		require.NoError(t, solver.Ultimate(&u, s, law, bending))
		if u.Equilibria > 1 && added.In(units.SquareMetre) > 0 {
			d := far
			if bending.Sense == mechanics.Hogging {
				d = s.Depth().Sub(far)
			}
			want := d.In(units.Metre) * law.Ultimate() / (law.Ultimate() + strain)
			found := math.Abs(u.NeutralAxis.In(units.Metre)/want-1) < 1e-9
			for _, c := range u.Others {
				found = found || math.Abs(c.In(units.Metre)/want-1) < 1e-9
			}
			require.True(t, found, "%v in %v", want, u)
			others++
			continue
		}
		scale := moment.Max(u.Concrete.MulLength(s.Depth()).Scale(0.01))
		require.InDelta(t, 0, u.Nominal.Sub(moment).Ratio(scale), 1e-9, "%+v %+v", s, bending)
		if added.IsZero() {
			single++
			require.GreaterOrEqual(t, u.ExtremeStrain, strain*(1-1e-9))
		} else {
			doubly++
			require.InEpsilon(t, strain, u.ExtremeStrain, 1e-9)
		}
	}
	require.True(t, others > 0 || testing.Short())
	require.Greater(t, doubly, cases(1000))
	require.Greater(t, single, cases(2000))
}

// An axial force beyond what the concrete balances at the limit takes compression
// steel whatever the moment, and no tension steel.
func TestRequiredBothUnderAxialForce(t *testing.T) {
	const b, h, d, dTop, strain = 12.0, 24.0, 21.5, 2.5, 0.005
	law := whitney(t, ksi(4), 0.85)
	c := d * 3 / 8
	most := 3.4 * b * 0.85 * c
	axial := most + 30
	tension, compression := mechanics.Layer{Depth: in(d), Steel: grade60}, mechanics.Layer{Depth: in(dTop), Steel: grade60}
	var solver mechanics.Solver
	area, added, err := solver.RequiredBoth(mechanics.Rectangle(in(b), in(h)), law, mechanics.Bending{Axial: units.Kip.Of(axial)},
		tension, compression, strain, units.KipInch.Of(100))
	require.NoError(t, err)
	stress := math.Min(60, 87*(c-dTop)/c) - 3.4
	require.InEpsilon(t, 30/stress, added.In(units.SquareInch), 1e-11)
	require.InDelta(t, 0, area.In(units.SquareInch), 1e-12)
	compression.Area = added
	tension.Area = in2(1e-8)
	u := solve(t, mechanics.Section{Parts: mechanics.Rectangle(in(b), in(h)), Layers: []mechanics.Layer{tension, compression}}, law,
		mechanics.Bending{Axial: units.Kip.Of(axial)})
	require.InEpsilon(t, strain, u.ExtremeStrain, 1e-6)
	require.Greater(t, u.Nominal.In(units.KipInch), 100.0)
}

func TestRequiredBothRefuses(t *testing.T) {
	law := whitney(t, ksi(4), 0.85)
	parts := mechanics.Rectangle(in(12), in(24))
	tension, compression := mechanics.Layer{Depth: in(21.5), Steel: grade60}, mechanics.Layer{Depth: in(2.5), Steel: grade60}
	moment := units.KipInch.Of(6000)
	var solver mechanics.Solver
	var input *mechanics.InputError
	call := func(tension, compression mechanics.Layer, strain float64, moment units.Moment) error {
		area, added, err := solver.RequiredBoth(parts, law, mechanics.Bending{}, tension, compression, strain, moment)
		if err != nil {
			require.True(t, area.IsZero() && added.IsZero())
		}
		return err
	}
	require.NoError(t, call(tension, compression, 0.005, moment))
	for _, test := range []struct {
		field, allowed string
		err            error
	}{
		{"moment", "above 0", call(tension, compression, 0.005, units.Moment{})},
		{"strain", "from 1e-06 to 1", call(tension, compression, 0, moment)},
		{"strain", "from 1e-06 to 1", call(tension, compression, math.NaN(), moment)},
		{"layers[0].depth", "0.6096 m", call(mechanics.Layer{Depth: in(-1), Steel: grade60}, compression, 0.005, moment)},
		{"layers[0].depth", "away from the compression face", call(mechanics.Layer{Steel: grade60}, compression, 0.005, moment)},
		{"layers[1].steel.yield", "MPa", call(tension, mechanics.Layer{Depth: in(2), Steel: mechanics.Steel{Modulus: ksi(29000)}}, 0.005, moment)},
		{"layers[1].depth", "nearer the compression face", call(tension, tension, 0.005, moment)},
		{"layers[1].depth", in(21.5).String(), call(tension, mechanics.Layer{Depth: in(23), Steel: grade60}, 0.005, moment)},
	} {
		require.ErrorAs(t, test.err, &input)
		require.Equal(t, test.field, input.Field)
		require.Contains(t, input.Allowed, test.allowed)
	}
	// Compression steel at the neutral axis, or below it, or no stronger than the
	// concrete that it displaces.
	c := 21.5 * 3 / 8
	most := 3.4 * 12 * 0.85 * c * (21.5 - 0.425*c)
	weak := mechanics.Layer{Depth: in(2.5), Steel: mechanics.Steel{Modulus: ksi(29000), Yield: ksi(3.4)}}
	for _, layer := range []mechanics.Layer{{Depth: in(c), Steel: grade60}, {Depth: in(15), Steel: grade60}, weak} {
		var unreachable *mechanics.UnreachableError
		require.ErrorAs(t, call(tension, layer, 0.005, moment), &unreachable)
		require.InEpsilon(t, most, unreachable.Greatest.In(units.KipInch), 1e-11)
		require.Equal(t, moment, unreachable.Moment)
	}
}

func TestRequiredSteelAllocatesNothing(t *testing.T) {
	law := whitney(t, ksi(4), 0.85)
	parts := mechanics.Tee(in(40), in(4), in(12), in(24))
	parts[1].BottomWidth = in(10)
	tension, compression := mechanics.Layer{Depth: in(21.5), Steel: grade60}, mechanics.Layer{Depth: in(2.5), Steel: grade60}
	strains := []float64{0.001, 0.002, 0.003}
	var solver mechanics.Solver
	var points []mechanics.CurvaturePoint
	section := mechanics.Section{Parts: parts, Layers: []mechanics.Layer{layerUS(21.5, 3, 60)}}
	curvature := solve(t, section, law, mechanics.Bending{}).Curvature.Scale(0.5)
	require.Zero(t, testing.AllocsPerRun(50, func() {
		if _, err := solver.RequiredTension(parts, law, mechanics.Bending{}, tension, units.KipInch.Of(9000)); err != nil {
			t.Fatal(err)
		}
		if _, _, err := solver.RequiredBoth(parts, law, mechanics.Bending{}, tension, compression, 0.005, units.KipInch.Of(15000)); err != nil {
			t.Fatal(err)
		}
		var err error
		if points, err = solver.MomentCurvature(points[:0], section, law, mechanics.Bending{}, strains, 0.01); err != nil {
			t.Fatal(err)
		}
		if _, err = solver.AtCurvature(section, law, mechanics.Bending{}, curvature); err != nil {
			t.Fatal(err)
		}
	}))
}
