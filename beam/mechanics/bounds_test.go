package mechanics_test

import (
	"fmt"
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// A bound is a value that an input may have at its limits and may not have next
// to them.
type bound struct {
	name            string
	inside, outside []float64
	field, allowed  string
	print           func(float64) string
	call            func(float64) error
}

// within are the limits of a range and their float64 neighbours outside it.
func within(low, high float64) (inside, outside []float64) {
	return []float64{low, high}, []float64{math.Nextafter(low, math.Inf(-1)), math.Nextafter(high, math.Inf(1)), math.NaN(), math.Inf(1), math.Inf(-1)}
}

func (b *bound) check(t *testing.T) {
	t.Helper()
	t.Run(b.name, func(t *testing.T) {
		var input *mechanics.InputError
		for _, v := range b.inside {
			if err := b.call(v); err != nil {
				require.NotErrorAs(t, err, &input, "%v", v)
			}
		}
		for _, v := range b.outside {
			require.ErrorAs(t, b.call(v), &input, "%v", v)
			require.Equal(t, mechanics.InputError{Field: b.field, Value: b.print(v), Allowed: b.allowed}, *input)
		}
	})
}

func shown[T fmt.Stringer](of func(float64) T) func(float64) string {
	return func(v float64) string { return of(v).String() }
}

func plain(v float64) string { return fmt.Sprint(v) }

func discard[T any](_ T, err error) error { return err }

// plainSection is a rectangle of 1 m with a layer of 100 mm2 halfway down.
func plainSection() mechanics.Section {
	return mechanics.Section{
		Parts:  mechanics.Rectangle(units.Metre.Of(1), units.Metre.Of(1)),
		Layers: []mechanics.Layer{layerSI(500, 100, 400)},
	}
}

func TestBoundsOfSections(t *testing.T) {
	metre, pascal, m2 := units.Metre.Of, units.Pascal.Of, units.SquareMetre.Of
	section := func(set func(s *mechanics.Section, v float64)) func(float64) error {
		return func(v float64) error {
			s := plainSection()
			set(&s, v)
			return s.Validate()
		}
	}
	ofParts := func(set func(s *mechanics.Section, v float64)) func(float64) error {
		return section(func(s *mechanics.Section, v float64) {
			s.Layers = nil
			set(s, v)
		})
	}
	lengths, notLengths := within(1e-4, 1e4)
	areas, notAreas := within(1e-12, 1e8)
	stresses := []float64{1e6}
	_, notStresses := within(1, 1e15)
	second := func(s *mechanics.Section, top, bottom float64) {
		s.Parts = append(s.Parts, mechanics.Part{Top: metre(top), Bottom: metre(bottom), Width: metre(1)})
	}
	for _, b := range []bound{
		{"bottom", lengths, notLengths, "parts[0].bottom", "at least 0.1 mm below its top, 0 m, and at most 10 km", shown(metre),
			ofParts(func(s *mechanics.Section, v float64) { s.Parts[0].Bottom = metre(v) })},
		{"bottom of the second part", []float64{1.0002, 1e4}, []float64{1, 1.00005, 0.5, math.NaN(), 10001}, "parts[1].bottom",
			"at least 0.1 mm below its top, 1 m, and at most 10 km", shown(metre),
			ofParts(func(s *mechanics.Section, v float64) { second(s, 1, v) })},
		// Two faces are the same within a billionth of their sum.
		{"top", []float64{0}, []float64{1e-300, -1e-300, 1e-9, math.NaN()}, "parts[0].top", "where the part above it ends, 0 m", shown(metre),
			ofParts(func(s *mechanics.Section, v float64) { s.Parts[0].Top = metre(v) })},
		{"top of the second part", []float64{1, 1 + 1.99e-9, 1 - 1.99e-9}, []float64{1 + 2.01e-9, 1 - 2.01e-9, math.NaN(), -1, 0}, "parts[1].top",
			"where the part above it ends, 1 m", shown(metre),
			ofParts(func(s *mechanics.Section, v float64) { second(s, v, 2) })},
		{"top of a thin second part", []float64{0.01 + 1.99e-11}, []float64{0.01 + 2.01e-11, 0.01 - 2.01e-11, 0.01 + 1e-9}, "parts[1].top",
			"where the part above it ends, 0.01 m", shown(metre),
			ofParts(func(s *mechanics.Section, v float64) {
				s.Parts[0].Bottom = metre(0.01)
				second(s, v, 2)
			})},
		{"top of the third part", []float64{2}, []float64{1, 0, 2.1}, "parts[2].top", "where the part above it ends, 2 m", shown(metre),
			ofParts(func(s *mechanics.Section, v float64) {
				second(s, 1, 2)
				second(s, v, 3)
			})},
		{"width", lengths, append(notLengths, 0), "parts[0].width", "from 0.1 mm to 10 km", shown(metre),
			section(func(s *mechanics.Section, v float64) { s.Parts[0].Width = metre(v) })},
		{"width below", append(lengths, 0), notLengths, "parts[0].bottomWidth", "from 0.1 mm to 10 km, or zero for the width at the top", shown(metre),
			section(func(s *mechanics.Section, v float64) { s.Parts[0].BottomWidth = metre(v) })},
		{"depth of a layer", []float64{0, math.Copysign(0, -1), 1e-300, 0.5, 1, 1 + 9e-10}, []float64{-5e-324, 1 + 1.1e-9, 2, math.NaN(), math.Inf(1)},
			"layers[0].depth", "from 0 to the depth of the section, 1 m", shown(metre),
			section(func(s *mechanics.Section, v float64) { s.Layers[0].Depth = metre(v) })},
		{"area of a layer", areas, notAreas, "layers[0].area", "from 1e-6 mm2 to 1e8 m2", shown(m2),
			section(func(s *mechanics.Section, v float64) { s.Layers[0].Area = m2(v) })},
		{"area of the second layer", areas, notAreas, "layers[1].area", "from 1e-6 mm2 to 1e8 m2", shown(m2),
			section(func(s *mechanics.Section, v float64) {
				s.Layers = append(s.Layers, layerSI(300, 1, 400))
				s.Layers[1].Area = m2(v)
			})},
		{"modulus", []float64{1, 1e15, 1e11}, notStresses, "layers[0].steel.modulus", "from 1e-6 to 1e9 MPa", shown(pascal),
			section(func(s *mechanics.Section, v float64) {
				s.Layers[0].Steel = mechanics.Steel{Modulus: pascal(v), Yield: pascal(max(1, v/1e3))}
			})},
		{"yield", append(stresses, 1, 1e15), notStresses, "layers[0].steel.yield", "from 1e-6 to 1e9 MPa", shown(pascal),
			section(func(s *mechanics.Section, v float64) {
				s.Layers[0].Steel = mechanics.Steel{Modulus: pascal(1e8), Yield: pascal(v)}
				if v > 1e8 {
					s.Layers[0].Steel.Modulus = pascal(1e15)
				}
			})},
		{"yield strain", []float64{1e3, 1e12}, []float64{math.Nextafter(1e3, 0), math.Nextafter(1e12, 1e13), 1.0009, 1.005e12},
			"layers[0].steel.yield", "from 1e-9 to 1 times its modulus, 1000000000000 Pa", shown(pascal),
			section(func(s *mechanics.Section, v float64) {
				s.Layers[0].Steel = mechanics.Steel{Modulus: pascal(1e12), Yield: pascal(v)}
			})},
	} {
		b.check(t)
	}
	err := mechanics.Section{}.Validate()
	require.Equal(t, &mechanics.InputError{Field: "parts", Value: "none", Allowed: "at least one rectangle"}, err)
	require.EqualError(t, err, "parts is none; allowed: at least one rectangle")
	require.Equal(t, units.Length{}, mechanics.Section{}.Depth())
	require.Equal(t, units.Metre.Of(1), plainSection().Depth())
	require.Equal(t, mm(700), mechanics.Section{Parts: mechanics.Tee(mm(900), mm(120), mm(300), mm(700))}.Depth())
}

func TestBoundsOfBending(t *testing.T) {
	law := whitney(t, mpa(30), 0.8)
	forces, notForces := within(-1e15, 1e15)
	ratios, notRatios := within(1, 1000)
	strains, notStrains := within(1e-6, 1)
	moments := []float64{math.SmallestNonzeroFloat64, 1e18}
	notMoments := []float64{0, -1, math.Nextafter(1e18, 2e18), math.NaN(), math.Inf(1)}
	tension := mechanics.Layer{Depth: mm(900), Steel: layerSI(0, 0, 400).Steel}
	compression := mechanics.Layer{Depth: mm(60), Steel: tension.Steel}
	parts := plainSection().Parts
	var solver mechanics.Solver
	axial := func(v float64) mechanics.Bending { return mechanics.Bending{Axial: units.Newton.Of(v)} }
	const ofForce, ofMoment = "from -1e12 to 1e12 kN", "above 0, at most 1e15 kN-m"
	cut, notCut := within(1e-4*law.Ultimate(), 0.003)
	// Under a block of 0.8 there is no stress below a fifth of the ultimate strain.
	cut[0] = 0.0007
	for _, b := range []bound{
		{"axial force", forces, notForces, "axial", ofForce, shown(units.Newton.Of),
			func(v float64) error { return discard(plainSection().Ultimate(law, axial(v))) }},
		{"axial force on fibres", forces, notForces, "axial", ofForce, shown(units.Newton.Of),
			func(v float64) error { return discard(plainSection().Fibres(law, axial(v))) }},
		{"uncracked", ratios, notRatios, "modular ratio", "from 1 to 1000", plain,
			func(v float64) error { return discard(plainSection().Uncracked(v)) }},
		{"cracked", ratios, notRatios, "modular ratio", "from 1 to 1000", plain,
			func(v float64) error { return discard(plainSection().Cracked(v, mechanics.Sagging)) }},
		{"breaking strain", append(strains, 0), notStrains, "breaking strain", "from 1e-06 to 1", plain,
			func(v float64) error {
				return discard(solver.MomentCurvature(nil, plainSection(), law, mechanics.Bending{}, []float64{0.003}, v))
			}},
		{"strain of a curve", cut, notCut, "strains[0]", "from 3e-07 to 0.003", plain,
			func(v float64) error {
				return discard(solver.MomentCurvature(nil, plainSection(), law, mechanics.Bending{}, []float64{v}, 0))
			}},
		{"strain of a truncated law", cut, notCut, "strain", "from 3e-07 to 0.003", plain,
			func(v float64) error { return discard(law.Truncated(v)) }},
		{"moment on a rectangle", moments, notMoments, "moment", ofMoment, shown(units.NewtonMetre.Of),
			func(v float64) error {
				return discard(mechanics.RequiredTension(mm(300), mm(600), law, tension.Steel, units.NewtonMetre.Of(v)))
			}},
		{"moment on a shape", moments, notMoments, "moment", ofMoment, shown(units.NewtonMetre.Of),
			func(v float64) error {
				return discard(solver.RequiredTension(parts, law, mechanics.Bending{}, tension, units.NewtonMetre.Of(v)))
			}},
		{"moment on a section", moments, notMoments, "moment", ofMoment, shown(units.NewtonMetre.Of),
			func(v float64) error {
				return discard(solver.RequiredArea(plainSection(), 0, law, mechanics.Bending{}, units.NewtonMetre.Of(v)))
			}},
		{"moment on two layers", moments, notMoments, "moment", ofMoment, shown(units.NewtonMetre.Of),
			func(v float64) error {
				_, _, err := solver.RequiredBoth(parts, law, mechanics.Bending{}, tension, compression, 0.005, units.NewtonMetre.Of(v))
				return err
			}},
		{"strain of two layers", strains, notStrains, "strain", "from 1e-06 to 1", plain,
			func(v float64) error {
				_, _, err := solver.RequiredBoth(parts, law, mechanics.Bending{}, tension, compression, v, units.NewtonMetre.Of(1e5))
				return err
			}},
		{"layer", []float64{0}, []float64{-1, 1, 2}, "layer", "an index into the 1 layers of the section", plain,
			func(v float64) error {
				return discard(solver.RequiredArea(plainSection(), int(v), law, mechanics.Bending{}, units.NewtonMetre.Of(1e4)))
			}},
		{"depth of tension steel", []float64{1e-8, 1}, []float64{0, 9e-10}, "layers[0].depth", "away from the compression face", shown(units.Metre.Of),
			func(v float64) error {
				layer := mechanics.Layer{Depth: units.Metre.Of(v), Steel: tension.Steel}
				return discard(solver.RequiredTension(parts, law, mechanics.Bending{}, layer, units.NewtonMetre.Of(1e-9)))
			}},
		{"depth of compression steel", []float64{0, 0.5, math.Nextafter(0.9, 0)}, []float64{0.9, 0.95, 1}, "layers[1].depth",
			"nearer the compression face than the tension steel, at 0.9 m", shown(units.Metre.Of),
			func(v float64) error {
				layer := mechanics.Layer{Depth: units.Metre.Of(v), Steel: tension.Steel}
				_, _, err := solver.RequiredBoth(parts, law, mechanics.Bending{}, tension, layer, 0.005, units.NewtonMetre.Of(1e5))
				return err
			}},
		// A tension halfway down, 0.4 m above the steel: with a moment of 40 N-m
		// that of 100 N leaves nothing about the steel.
		{"axial force that leaves compression", []float64{-99.9, 0, 100}, []float64{-100, -101, -1e9}, "axial",
			"a force with which the moment about the tension steel is above 0", shown(units.Newton.Of),
			func(v float64) error {
				return discard(solver.RequiredTension(parts, law, axial(v), tension, units.NewtonMetre.Of(40)))
			}},
	} {
		b.check(t)
	}

	for _, bending := range []mechanics.Bending{{Sense: mechanics.Hogging, Displaced: mechanics.Ignore}, {}} {
		s := plainSection()
		require.NoError(t, discard(s.Ultimate(law, bending)))
		require.NoError(t, discard(s.Fibres(law, bending)))
		require.NoError(t, discard(s.Cracked(8, bending.Sense)))
	}
	known := "Sagging or Hogging"
	require.Equal(t, &mechanics.InputError{Field: "sense", Value: "Sense(2)", Allowed: known}, discard(plainSection().Ultimate(law, mechanics.Bending{Sense: 2})))
	require.Equal(t, &mechanics.InputError{Field: "sense", Value: "Sense(2)", Allowed: known}, discard(plainSection().Cracked(8, 2)))
	require.Equal(t, &mechanics.InputError{Field: "displaced", Value: "unknown", Allowed: "Deduct or Ignore"}, discard(plainSection().Ultimate(law, mechanics.Bending{Displaced: 2})))
	require.Equal(t, "law", inputField(t, discard(plainSection().Ultimate(mechanics.Law{}, mechanics.Bending{}))))
	for _, bending := range []mechanics.Bending{{Sense: 2}, {Displaced: 2}} {
		require.Equal(t, "bending", inputField(t, discard(plainSection().Fibres(law, bending))))
	}
	// Strains increase.
	err := discard(solver.MomentCurvature(nil, plainSection(), law, mechanics.Bending{}, []float64{0.001, 0.001}, 0))
	require.Equal(t, &mechanics.InputError{Field: "strains[1]", Value: "0.001", Allowed: "above the one before it, 0.001"}, err)
	// A curvature is at most that of the ultimate, and at least a millionth of it.
	u := solve(t, plainSection(), law, mechanics.Bending{})
	parabola, err := mechanics.ParabolaRectangle(mpa(25), 0.002, 0.0035, 2)
	require.NoError(t, err)
	u = solve(t, plainSection(), parabola, mechanics.Bending{})
	low := 1e-6 * u.Curvature.In(units.PerMetre)
	most := u.Curvature.In(units.PerMetre)
	b := bound{"curvature", []float64{low, 2 * low, most, most * (1 + 9e-10)}, []float64{math.Nextafter(low, 0), low / 2, most * (1 + 1.1e-9), 0, -low},
		"curvature", "from 1e-6 of the ultimate curvature up to it, " + u.Curvature.String(), shown(units.PerMetre.Of),
		func(v float64) error {
			return discard(solver.AtCurvature(plainSection(), parabola, mechanics.Bending{}, units.PerMetre.Of(v)))
		}}
	b.check(t)
}

func inputField(t *testing.T, err error) string {
	t.Helper()
	var input *mechanics.InputError
	require.ErrorAs(t, err, &input)
	return input.Field
}

func TestBoundsOfLaws(t *testing.T) {
	pascal := units.Pascal.Of
	stresses, notStresses := within(1, 1e15)
	ultimates, notUltimates := within(1e-5, 0.1)
	factors, notFactors := within(0.01, 1)
	exponents, notExponents := within(1, 4)
	ultimate := 0.0035
	peaks, notPeaks := within(0.01*ultimate, ultimate)
	const ofStress, ofUltimate = "from 1e-6 to 1e9 MPa", "from 1e-05 to 0.1"
	constant := func(v float64) func(float64) units.Stress {
		return func(float64) units.Stress { return pascal(v) }
	}
	flat := func(strains ...float64) []mechanics.Point {
		var points []mechanics.Point
		for _, v := range strains {
			points = append(points, mechanics.Point{Strain: v, Stress: mpa(20)})
		}
		return points
	}
	least := 1e-6 * ultimate
	kinks, notKinks := within(least, ultimate*(1-1e-6))
	after := 0.001/ultimate*ultimate + 1e-6*ultimate
	laterKinks, notLaterKinks := within(after, ultimate*(1-1e-6))
	// The second of three points, the last at 0.003; and the last of two.
	later := 0.001 + 1e-9*0.003
	last := 0.0999 + 1e-9*0.1
	for _, b := range []bound{
		{"intensity", stresses, notStresses, "intensity", ofStress, shown(pascal),
			func(v float64) error { return discard(mechanics.RectangularBlock(pascal(v), 0.8, 0.003)) }},
		{"ultimate strain of a block", ultimates, notUltimates, "ultimate strain", ofUltimate, plain,
			func(v float64) error { return discard(mechanics.RectangularBlock(mpa(20), 0.8, v)) }},
		{"depth factor", factors, notFactors, "depth factor", "from 0.01 to 1", plain,
			func(v float64) error { return discard(mechanics.RectangularBlock(mpa(20), v, 0.003)) }},
		{"strength", stresses, notStresses, "strength", ofStress, shown(pascal),
			func(v float64) error { return discard(mechanics.ParabolaRectangle(pascal(v), 0.002, ultimate, 2)) }},
		{"ultimate strain of a parabola", ultimates, notUltimates, "ultimate strain", ofUltimate, plain,
			func(v float64) error { return discard(mechanics.ParabolaRectangle(mpa(20), v/2, v, 2)) }},
		{"peak", peaks, notPeaks, "peak strain", "from 3.5e-05 to 0.0035", plain,
			func(v float64) error { return discard(mechanics.ParabolaRectangle(mpa(20), v, ultimate, 2)) }},
		{"peak of lines", peaks, notPeaks, "peak strain", "from 3.5e-05 to 0.0035", plain,
			func(v float64) error { return discard(mechanics.Bilinear(mpa(20), v, ultimate)) }},
		{"exponent", exponents, notExponents, "exponent", "from 1 to 4", plain,
			func(v float64) error { return discard(mechanics.ParabolaRectangle(mpa(20), 0.002, ultimate, v)) }},
		{"ultimate strain of a curve", ultimates, notUltimates, "ultimate strain", ofUltimate, plain,
			func(v float64) error { return discard(mechanics.Curve(constant(1e6), v)) }},
		{"kink", kinks, notKinks, "kinks[0]", "from 3.5e-09 to 0.0035", plain,
			func(v float64) error { return discard(mechanics.Curve(constant(1e6), ultimate, v)) }},
		{"second kink", laterKinks, notLaterKinks, "kinks[1]", "from 0.001 to 0.0035", plain,
			func(v float64) error { return discard(mechanics.Curve(constant(1e6), ultimate, 0.001, v)) }},
		{"greatest stress of a curve", stresses, []float64{math.Nextafter(1, 0), 0}, "greatest stress", "at least 1 Pa",
			func(v float64) string { return fmt.Sprintf("%v Pa", v) },
			func(v float64) error { return discard(mechanics.Curve(constant(v), ultimate)) }},
		{"stress of a curve", []float64{0, 1, 1e7}, []float64{-math.SmallestNonzeroFloat64, math.Nextafter(1e15, 1e16), math.NaN()},
			"stress at 0.5 of the ultimate strain", "from 0 to 1e9 MPa", func(v float64) string { return fmt.Sprintf("%v Pa", v) },
			func(v float64) error {
				return discard(mechanics.Curve(func(strain float64) units.Stress {
					if strain == ultimate*0.5 {
						return pascal(v)
					}
					return mpa(1)
				}, ultimate))
			}},
		{"greatest stress of lines", stresses, []float64{math.Nextafter(1, 0), 0}, "greatest stress", ofStress, shown(pascal),
			func(v float64) error {
				return discard(mechanics.Polyline(mechanics.Point{}, mechanics.Point{Strain: 0.001, Stress: pascal(v)}, mechanics.Point{Strain: 0.003}))
			}},
		{"stress of a point", []float64{0, 1e15}, []float64{-math.SmallestNonzeroFloat64, math.Nextafter(1e15, 1e16), math.NaN()}, "points[1].stress",
			"from 0 to 1e9 MPa", shown(pascal),
			func(v float64) error {
				return discard(mechanics.Polyline(mechanics.Point{Stress: mpa(1)}, mechanics.Point{Strain: 0.001, Stress: pascal(v)}, mechanics.Point{Strain: 0.003}))
			}},
		{"strain of the first point", []float64{0, 0.001}, []float64{-math.SmallestNonzeroFloat64, math.NaN(), math.Nextafter(0.1, 1)}, "points[0].strain", "from 0 to 0.1", plain,
			func(v float64) error { return discard(mechanics.Polyline(flat(v, 0.003)...)) }},
		{"strain of a later point", []float64{later, 0.002}, []float64{math.Nextafter(later, 0), 0.001, 0, math.NaN(), math.Nextafter(0.1, 1)}, "points[1].strain",
			"from 0.001 to 0.1", plain,
			func(v float64) error { return discard(mechanics.Polyline(flat(0.001, v, 0.003)...)) }},
		{"strain of the last point", []float64{last, 0.1}, []float64{math.Nextafter(0.1, 1)}, "points[1].strain", "from 0.0999 to 0.1", plain,
			func(v float64) error { return discard(mechanics.Polyline(flat(0.0999, v)...)) }},
	} {
		b.check(t)
	}
	require.Equal(t, &mechanics.InputError{Field: "points", Value: "1", Allowed: "at least 2"}, discard(mechanics.Polyline(flat(0.003)...)))
	require.NoError(t, discard(mechanics.Polyline(flat(0, 0.003)...)))
}
