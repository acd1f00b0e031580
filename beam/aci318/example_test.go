package aci318_test

import (
	"fmt"
	"log"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
	"soffit.example/units"
)

// The steel that a moment needs, first with tension steel alone, then more
// than it can carry.
func ExampleCode_RequiredSteel() {
	q := aci318.SteelQuery{
		Section: beam.Section{Shape: beam.Rectangular, Width: units.Inch.Of(14), Depth: units.Inch.Of(24)},
		Depth:   units.Inch.Of(21.5), Top: units.Inch.Of(2.5),
		Strength: units.PSI.Of(4000), Yield: units.KSI.Of(60), Moment: units.KipFoot.Of(345.6),
	}
	for _, moment := range []float64{345.6, 560} {
		q.Moment = units.KipFoot.Of(moment)
		s, err := aci318.ACI31819().RequiredSteel(q)
		if err != nil {
			log.Fatal(err)
		}
		fmt.Printf("%v kip-ft: As = %.2f in2, A's = %.2f in2, φ = %.2f\n",
			moment, s.Tension.In(units.SquareInch), s.Compression.In(units.SquareInch), s.Phi)
	}
	// Output:
	// 345.6 kip-ft: As = 4.05 in2, A's = 0.00 in2, φ = 0.90
	// 560 kip-ft: As = 6.80 in2, A's = 1.50 in2, φ = 0.90
}

// The strengths of a section that exists.
func ExampleCode_Strengths() {
	s, err := aci318.ACI31819M().Strengths(beam.SectionQuery{
		Section:  beam.Section{Shape: beam.Rectangular, Width: units.Millimetre.Of(300), Depth: units.Millimetre.Of(600)},
		Concrete: beam.Concrete{Strength: units.Megapascal.Of(30)},
		Bending:  beam.Positive,
		Layers:   []beam.SteelLayer{{Area: units.SquareMillimetre.Of(1530), Depth: units.Millimetre.Of(540), Yield: units.Megapascal.Of(420)}},
	})
	if err != nil {
		log.Fatal(err)
	}
	f := s.Flexure
	fmt.Printf("a = %.1f mm, strain %.4f, %s\n", f.BlockDepth.In(units.Millimetre), f.ExtremeStrain, f.Class)
	fmt.Printf("φMn = %.1f kN-m, φVc = %.1f kN by row (%s)\n",
		f.Design.In(units.KilonewtonMetre), s.Shear.Design.In(units.Kilonewton), s.Shear.ConcreteRow)
	// Output:
	// a = 84.0 mm, strain 0.0131, tension-controlled
	// φMn = 288.0 kN-m, φVc = 73.9 kN by row (c)
}
