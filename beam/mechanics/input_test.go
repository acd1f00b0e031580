package mechanics_test

import (
	"encoding/binary"
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

func TestSectionRefuses(t *testing.T) {
	good := func() mechanics.Section {
		return mechanics.Section{
			Parts:  mechanics.Tee(mm(900), mm(120), mm(300), mm(700)),
			Layers: []mechanics.Layer{layerSI(640, 2000, 420)},
		}
	}
	nan, inf := math.NaN(), math.Inf(1)
	tests := []struct {
		name, field, allowed string
		spoil                func(*mechanics.Section)
	}{
		{"no parts", "parts", "at least one", func(s *mechanics.Section) { s.Parts = nil }},
		{"gap below the face", "parts[0].top", "0 m", func(s *mechanics.Section) { s.Parts[0].Top = mm(1) }},
		{"gap between parts", "parts[1].top", "0.12 m", func(s *mechanics.Section) { s.Parts[1].Top = mm(121) }},
		{"overlap", "parts[1].top", "0.12 m", func(s *mechanics.Section) { s.Parts[1].Top = mm(119) }},
		{"part of no depth", "parts[0].bottom", "0.1 mm", func(s *mechanics.Section) { s.Parts[0].Bottom = mm(0) }},
		{"part upside down", "parts[1].bottom", "0.1 mm", func(s *mechanics.Section) { s.Parts[1].Bottom = mm(100) }},
		{"too deep", "parts[1].bottom", "10 km", func(s *mechanics.Section) { s.Parts[1].Bottom = units.Metre.Of(1e5) }},
		{"infinitely deep", "parts[1].bottom", "10 km", func(s *mechanics.Section) { s.Parts[1].Bottom = mm(inf) }},
		{"no width", "parts[0].width", "0.1 mm", func(s *mechanics.Section) { s.Parts[0].Width = mm(0) }},
		{"negative width", "parts[0].width", "0.1 mm", func(s *mechanics.Section) { s.Parts[0].Width = mm(-300) }},
		{"NaN width", "parts[0].width", "0.1 mm", func(s *mechanics.Section) { s.Parts[0].Width = mm(nan) }},
		{"negative width below", "parts[1].bottomWidth", "zero for the width at the top", func(s *mechanics.Section) { s.Parts[1].BottomWidth = mm(-300) }},
		{"too wide below", "parts[0].bottomWidth", "10 km", func(s *mechanics.Section) { s.Parts[0].BottomWidth = units.Metre.Of(1e5) }},
		{"NaN width below", "parts[0].bottomWidth", "0.1 mm", func(s *mechanics.Section) { s.Parts[0].BottomWidth = mm(nan) }},
		{"layer above the section", "layers[0].depth", "0.7 m", func(s *mechanics.Section) { s.Layers[0].Depth = mm(-1) }},
		{"layer below the section", "layers[0].depth", "0.7 m", func(s *mechanics.Section) { s.Layers[0].Depth = mm(701) }},
		{"NaN depth", "layers[0].depth", "0.7 m", func(s *mechanics.Section) { s.Layers[0].Depth = mm(nan) }},
		{"no area", "layers[0].area", "1e-6 mm2", func(s *mechanics.Section) { s.Layers[0].Area = mm2(0) }},
		{"negative area", "layers[0].area", "1e-6 mm2", func(s *mechanics.Section) { s.Layers[0].Area = mm2(-5) }},
		{"infinite area", "layers[0].area", "1e-6 mm2", func(s *mechanics.Section) { s.Layers[0].Area = mm2(inf) }},
		{"no modulus", "layers[0].steel.modulus", "MPa", func(s *mechanics.Section) { s.Layers[0].Steel.Modulus = mpa(0) }},
		{"no yield", "layers[0].steel.yield", "MPa", func(s *mechanics.Section) { s.Layers[0].Steel.Yield = mpa(0) }},
		{"yield above modulus", "layers[0].steel.yield", "modulus", func(s *mechanics.Section) { s.Layers[0].Steel.Yield = mpa(3e5) }},
	}
	law := whitney(t, mpa(30), 0.85)
	for _, test := range tests {
		t.Run(test.name, func(t *testing.T) {
			s := good()
			test.spoil(&s)
			_, ultimate := s.Ultimate(law, mechanics.Bending{})
			_, fibres := s.Fibres(law, mechanics.Bending{})
			_, cracked := s.Cracked(8, mechanics.Sagging)
			_, uncracked := s.Uncracked(8)
			for _, err := range []error{s.Validate(), ultimate, fibres, cracked, uncracked} {
				var input *mechanics.InputError
				require.ErrorAs(t, err, &input)
				require.Equal(t, test.field, input.Field)
				require.Contains(t, input.Allowed, test.allowed)
				require.NotEmpty(t, input.Value)
			}
		})
	}
	require.NoError(t, good().Validate())
	require.True(t, mechanics.Section{}.Depth().IsZero())
}

func TestBendingRefuses(t *testing.T) {
	s := mechanics.Section{Parts: mechanics.Rectangle(mm(300), mm(600)), Layers: []mechanics.Layer{layerSI(540, 2000, 420)}}
	law := whitney(t, mpa(30), 0.85)
	var input *mechanics.InputError
	for _, b := range []mechanics.Bending{{Sense: 2}, {Displaced: 2}, {Axial: units.Newton.Of(math.NaN())}, {Axial: units.Newton.Of(math.Inf(-1))}} {
		_, err := s.Ultimate(law, b)
		require.ErrorAs(t, err, &input)
		_, err = s.Fibres(law, b)
		require.ErrorAs(t, err, &input)
	}
	_, err := s.Ultimate(mechanics.Law{}, mechanics.Bending{})
	require.ErrorAs(t, err, &input)
	require.Equal(t, "law", input.Field)
	_, err = s.Fibres(mechanics.Law{}, mechanics.Bending{})
	require.ErrorAs(t, err, &input)
	_, err = s.Cracked(8, 7)
	require.ErrorAs(t, err, &input)
	for _, n := range []float64{0.5, math.NaN(), 1e6} {
		_, err = s.Cracked(n, mechanics.Hogging)
		require.ErrorAs(t, err, &input)
		require.Equal(t, "modular ratio", input.Field)
	}
	require.Equal(t, "sagging hogging Sense(9)", mechanics.Sagging.String()+" "+mechanics.Hogging.String()+" "+mechanics.Sense(9).String())
}

// A face that came by another sum differs in its last bits and is the same face.
func TestFacesMeetWithinRounding(t *testing.T) {
	s := mechanics.Section{Parts: []mechanics.Part{
		{Bottom: units.Metre.Of(0.1 + 0.2), Width: mm(500)},
		{Top: units.Metre.Of(0.3), Bottom: mm(700), Width: mm(250)},
	}}
	require.NoError(t, s.Validate())
}

// FuzzUltimate feeds any bit patterns as a section of two parts and three
// layers under any of the laws. Whatever comes, there is no panic and no
// number that is not finite: an error of the package's own, or a result in
// equilibrium.
func FuzzUltimate(f *testing.F) {
	seed := func(values ...float64) {
		var b []byte
		for _, v := range values {
			b = binary.LittleEndian.AppendUint64(b, math.Float64bits(v))
		}
		f.Add(uint8(0), b)
		f.Add(uint8(7), b)
	}
	seed(25.5, 0.85, 0.003, 120, 700, 900, 300, 640, 2000, 420, 60, 800, 420, 580, 100, 500, 0)
	seed(20, 0.8, 0.0035, 100, 200, 300, 300, 0, 1, 400, 200, 1, 400, 100, 1e6, 1e4, 1e3)
	seed(25.5, 0.85, 0.003, 120, 700, 900, 300, 640, 2000, 420, 60, 800, 420, 580, 100, 500, 0, 200, 350)
	seed(30, 0.2, 0.002, 0.2, 500, 9000, 0.2, 400, 1000, 400, 100, 1, 400, 100, 1e6, 1e4, 100, 0.2, 5000)
	seed(math.NaN(), 1, 0.1, 1e-300, 1e300, math.Inf(1), -1, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0)
	seed(1e-6, 0.01, 1e-5, 0.1, 1e7, 0.1, 1e7, 1e-9, 1e14, 1e-3, 1e7, 1e-6, 2e5, 5e6, 1, 1, -1e-9)
	f.Fuzz(func(t *testing.T, kind uint8, data []byte) {
		v := make([]float64, 19)
		for i := range v {
			if len(data) < 8*(i+1) {
				break
			}
			v[i] = math.Float64frombits(binary.LittleEndian.Uint64(data[8*i:]))
		}
		var law mechanics.Law
		var err error
		switch kind / 4 % 4 {
		case 0:
			law, err = mechanics.RectangularBlock(mpa(v[0]), v[1], v[2])
		case 1:
			law, err = mechanics.ParabolaRectangle(mpa(v[0]), v[1]*v[2], v[2], 2)
		case 2:
			law, err = mechanics.Bilinear(mpa(v[0]), v[1]*v[2], v[2])
		case 3:
			law, err = mechanics.Polyline(mechanics.Point{Stress: mpa(v[0])}, mechanics.Point{Strain: v[1] * v[2], Stress: mpa(v[0] * v[1])}, mechanics.Point{Strain: v[2]})
		}
		if err != nil {
			return
		}
		s := mechanics.Section{Parts: mechanics.Tee(mm(v[5]), mm(v[3]), mm(v[6]), mm(v[4]))}
		s.Parts[0].BottomWidth, s.Parts[1].BottomWidth = mm(v[17]), mm(v[18])
		for i := 7; i < 16; i += 3 {
			s.Layers = append(s.Layers, layerSI(v[i], v[i+1], v[i+2]))
		}
		bending := mechanics.Bending{Sense: mechanics.Sense(kind % 2), Displaced: mechanics.Displaced(kind / 2 % 2), Axial: units.Kilonewton.Of(v[16])}
		u, err := s.Ultimate(law, bending)
		if err != nil {
			var none *mechanics.NoEquilibriumError
			var input *mechanics.InputError
			if !asEither(err, &none, &input) {
				t.Fatalf("unexpected error %v", err)
			}
			return
		}
		// The last bit of the neutral axis is worth a last bit of what the steel
		// could carry, however little it does.
		size := u.Concrete.Abs().Add(bending.Axial.Abs())
		for i, l := range u.Layers {
			requireFinite(t, l.Strain, l.Stress.In(units.Pascal), l.Force.In(units.Newton))
			size = size.Add(s.Layers[i].Steel.Yield.MulArea(s.Layers[i].Area))
		}
		requireFinite(t, u.NeutralAxis.In(units.Metre), u.CompressionDepth.In(units.Metre), u.Nominal.In(units.NewtonMetre),
			u.Concrete.In(units.Newton), u.ConcreteDepth.In(units.Metre), u.ExtremeStrain, u.EffectiveDepth.In(units.Metre),
			u.TensionSideDepth.In(units.Metre), u.Residual.In(units.Newton), u.Curvature.In(units.PerMetre))
		for _, c := range u.Others {
			requireFinite(t, c.In(units.Metre))
		}
		require.Equal(t, u.Equilibria, 1+len(u.Others))
		require.Positive(t, u.NeutralAxis.In(units.Metre))
		require.LessOrEqual(t, u.Residual.Abs().Ratio(size), 1e-6)
		if f, err := s.Fibres(law, bending); err == nil {
			requireFinite(t, f.NeutralAxis.In(units.Metre), f.Nominal.In(units.NewtonMetre), f.Concrete.In(units.Newton))
		}
		var solver mechanics.Solver
		if p, err := solver.AtCurvature(s, law, bending, u.Curvature.Scale(0.5)); err == nil {
			requireFinite(t, p.NeutralAxis.In(units.Metre), p.Moment.In(units.NewtonMetre), p.ExtremeStrain)
			require.Positive(t, p.Strain)
		}
		if area, err := solver.RequiredTension(s.Parts, law, bending, s.Layers[0], u.Nominal); err == nil {
			requireFinite(t, area.In(units.SquareMetre))
			require.GreaterOrEqual(t, area.In(units.SquareMetre), 0.0)
		}
		if area, added, err := solver.RequiredBoth(s.Parts, law, bending, s.Layers[0], s.Layers[1], law.Ultimate(), u.Nominal); err == nil {
			requireFinite(t, area.In(units.SquareMetre), added.In(units.SquareMetre))
			require.GreaterOrEqual(t, added.In(units.SquareMetre), 0.0)
		}
		if c, err := s.Cracked(8, bending.Sense); err == nil {
			requireFinite(t, c.NeutralAxis.In(units.Metre), c.SecondMoment.In(units.Metre4))
			require.LessOrEqual(t, c.NeutralAxis.In(units.Metre), s.Depth().In(units.Metre))
		}
	})
}
