package mechanics_test

import (
	"fmt"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// A rectangle with tension and compression steel under a rectangular block.
func ExampleSection_Ultimate() {
	block, err := mechanics.RectangularBlock(units.KSI.Of(3.4), 0.85, 0.003)
	if err != nil {
		fmt.Println(err)
		return
	}
	steel := mechanics.Steel{Modulus: units.KSI.Of(29000), Yield: units.KSI.Of(60)}
	section := mechanics.Section{
		Parts: mechanics.Rectangle(units.Inch.Of(14), units.Inch.Of(24)),
		Layers: []mechanics.Layer{
			{Depth: units.Inch.Of(2.5), Area: units.SquareInch.Of(1.2), Steel: steel},
			{Depth: units.Inch.Of(21.5), Area: units.SquareInch.Of(6), Steel: steel},
		},
	}
	u, err := section.Ultimate(block, mechanics.Bending{})
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("neutral axis %.3f in, tension strain %.5f, moment %.1f kip-ft\n",
		u.NeutralAxis.In(units.Inch), u.ExtremeStrain, u.Nominal.In(units.KipFoot))
	fmt.Printf("top steel %.1f ksi, less %.1f ksi of concrete\n",
		u.Layers[0].Stress.In(units.KSI), u.Layers[0].Displaced.In(units.KSI))
	// Output:
	// neutral axis 7.302 in, tension strain 0.00583, moment 555.1 kip-ft
	// top steel 57.2 ksi, less 3.4 ksi of concrete
}

// One Solver and one Ultimate serve any number of sections, and allocate
// nothing once they have grown.
func ExampleSolver() {
	law, err := mechanics.ParabolaRectangle(units.Megapascal.Of(20), 0.002, 0.0035, 2)
	if err != nil {
		fmt.Println(err)
		return
	}
	steel := mechanics.Steel{Modulus: units.Gigapascal.Of(200), Yield: units.Megapascal.Of(435)}
	section := mechanics.Section{
		Parts:  mechanics.Tee(units.Millimetre.Of(900), units.Millimetre.Of(120), units.Millimetre.Of(300), units.Millimetre.Of(600)),
		Layers: []mechanics.Layer{{Depth: units.Millimetre.Of(60), Steel: steel}},
	}
	var solver mechanics.Solver
	var u mechanics.Ultimate
	for _, area := range []float64{1000, 2000, 3000} {
		section.Layers[0].Area = units.SquareMillimetre.Of(area)
		if err := solver.Ultimate(&u, section, law, mechanics.Bending{Sense: mechanics.Hogging}); err != nil {
			fmt.Println(err)
			return
		}
		fmt.Printf("%.0f mm2: %.0f kN-m\n", area, u.Nominal.In(units.KilonewtonMetre))
	}
	// Output:
	// 1000 mm2: 219 kN-m
	// 2000 mm2: 405 kN-m
	// 3000 mm2: 559 kN-m
}

// The same section by two routes that share no function.
func ExampleSection_Fibres() {
	block, err := mechanics.RectangularBlock(units.Megapascal.Of(25.5), 0.85, 0.003)
	if err != nil {
		fmt.Println(err)
		return
	}
	steel := mechanics.Steel{Modulus: units.Gigapascal.Of(200), Yield: units.Megapascal.Of(420)}
	section := mechanics.Section{
		Parts: mechanics.Rectangle(units.Millimetre.Of(300), units.Millimetre.Of(600)),
		Layers: []mechanics.Layer{
			{Depth: units.Millimetre.Of(540), Area: units.SquareMillimetre.Of(1476), Steel: steel},
			{Depth: units.Millimetre.Of(60), Area: units.SquareMillimetre.Of(2000), Steel: steel},
		},
	}
	u, err := section.Ultimate(block, mechanics.Bending{})
	if err != nil {
		fmt.Println(err)
		return
	}
	f, err := section.Fibres(block, mechanics.Bending{})
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("polynomial: %.2f kN-m, %d equilibria\n", u.Nominal.In(units.KilonewtonMetre), u.Equilibria)
	fmt.Printf("fibres:     %.2f kN-m, %d equilibria\n", f.Nominal.In(units.KilonewtonMetre), f.Equilibria)
	// Output:
	// polynomial: 311.33 kN-m, 2 equilibria
	// fibres:     311.33 kN-m, 2 equilibria
}

func ExampleRequiredTension() {
	block, err := mechanics.RectangularBlock(units.KSI.Of(3.4), 0.85, 0.003)
	if err != nil {
		fmt.Println(err)
		return
	}
	steel := mechanics.Steel{Modulus: units.KSI.Of(29000), Yield: units.KSI.Of(60)}
	area, err := mechanics.RequiredTension(units.Inch.Of(12), units.Inch.Of(21.5), block, steel, units.KipFoot.Of(250))
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("%.3f in2\n", area.In(units.SquareInch))
	// Output:
	// 2.548 in2
}

func ExampleSection_Cracked() {
	steel := mechanics.Steel{Modulus: units.KSI.Of(29000), Yield: units.KSI.Of(40)}
	section := mechanics.Section{
		Parts: mechanics.Rectangle(units.Inch.Of(12), units.Inch.Of(22)),
		Layers: []mechanics.Layer{
			{Depth: units.Inch.Of(2.5), Area: units.SquareInch.Of(0.6), Steel: steel},
			{Depth: units.Inch.Of(19.5), Area: units.SquareInch.Of(1.8), Steel: steel},
		},
	}
	c, err := section.Cracked(8.7, mechanics.Sagging)
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Printf("neutral axis %.2f in, second moment %.0f in4\n", c.NeutralAxis.In(units.Inch), c.SecondMoment.In(units.Inch4))
	fmt.Printf("steel stress %.1f ksi\n", c.SteelStress(units.KipFoot.Of(58.7), units.Inch.Of(19.5)).In(units.KSI))
	// Output:
	// neutral axis 5.77 in, second moment 3770 in4
	// steel stress 22.3 ksi
}

// The way of a beam to its strength: cracked and elastic at first, then with
// yielding steel.
func ExampleSolver_MomentCurvature() {
	law, err := mechanics.ParabolaRectangle(units.Megapascal.Of(30), 0.002, 0.0035, 2)
	if err != nil {
		fmt.Println(err)
		return
	}
	steel := mechanics.Steel{Modulus: units.Gigapascal.Of(200), Yield: units.Megapascal.Of(500)}
	section := mechanics.Section{
		Parts:  mechanics.Rectangle(units.Millimetre.Of(300), units.Millimetre.Of(600)),
		Layers: []mechanics.Layer{{Depth: units.Millimetre.Of(540), Area: units.SquareMillimetre.Of(1500), Steel: steel}},
	}
	var solver mechanics.Solver
	points, err := solver.MomentCurvature(nil, section, law, mechanics.Bending{}, []float64{0.0003, 0.0006, 0.0015, 0.0035}, 0)
	if err != nil {
		fmt.Println(err)
		return
	}
	for _, p := range points {
		fmt.Printf("%.4f: %6.2f /km, %3.0f kN-m, steel at %.4f\n",
			p.Strain, 1000*p.Curvature.In(units.PerMetre), p.Moment.In(units.KilonewtonMetre), p.ExtremeStrain)
	}
	// Output:
	// 0.0003:   1.84 /km, 101 kN-m, steel at 0.0007
	// 0.0006:   3.61 /km, 195 kN-m, steel at 0.0013
	// 0.0015:  10.12 /km, 365 kN-m, steel at 0.0040
	// 0.0035:  34.00 /km, 373 kN-m, steel at 0.0149
}

// The steel of a tee with a web that tapers, for a moment that the concrete alone
// cannot balance while the tension steel is strained by 0.005.
func ExampleSolver_RequiredBoth() {
	block, err := mechanics.RectangularBlock(units.Megapascal.Of(25.5), 0.85, 0.003)
	if err != nil {
		fmt.Println(err)
		return
	}
	mm := units.Millimetre.Of
	parts := mechanics.Tee(mm(400), mm(100), mm(300), mm(600))
	parts[1].BottomWidth = mm(250)
	steel := mechanics.Steel{Modulus: units.Gigapascal.Of(200), Yield: units.Megapascal.Of(420)}
	tension, compression := mechanics.Layer{Depth: mm(540), Steel: steel}, mechanics.Layer{Depth: mm(60), Steel: steel}
	var solver mechanics.Solver
	for _, moment := range []float64{500, 900} {
		below, above, err := solver.RequiredBoth(parts, block, mechanics.Bending{}, tension, compression, 0.005, units.KilonewtonMetre.Of(moment))
		if err != nil {
			fmt.Println(err)
			return
		}
		fmt.Printf("%.0f kN-m: %.0f mm2 below, %.0f mm2 above\n", moment, below.In(units.SquareMillimetre), above.In(units.SquareMillimetre))
	}
	// Output:
	// 500 kN-m: 2430 mm2 below, 0 mm2 above
	// 900 kN-m: 4619 mm2 below, 950 mm2 above
}
