package bars_test

import (
	"fmt"
	"log"

	"soffit.example/bars"
	"soffit.example/units"
)

func Example() {
	catalog, err := bars.Lookup("astm-inch")
	if err != nil {
		log.Fatal(err)
	}
	nine, err := catalog.Size("#9")
	if err != nil {
		log.Fatal(err)
	}
	four, err := catalog.Size("#4")
	if err != nil {
		log.Fatal(err)
	}

	cage := bars.Cage{
		Width:     units.Inch.Of(16),
		SideCover: units.Inch.Of(1.5), FaceCover: units.Inch.Of(1.5),
		Stirrup: four,
	}
	need := bars.Clearances{
		InLayer:       bars.Clearance{Least: units.Inch.Of(1), Diameters: 1},
		BetweenLayers: bars.Clearance{Least: units.Inch.Of(1)},
	}
	fit, err := cage.Fit([]bars.Layer{{{Size: nine, Count: 4}}, {{Size: nine, Count: 2}}}, need)
	if err != nil {
		log.Fatal(err)
	}
	in := units.Inch.Format
	for _, b := range fit.Bars {
		fmt.Printf("layer %d  %s  x %.3f  y %.3f in\n", b.Layer, b.Size, b.X.In(units.Inch), b.Y.In(units.Inch))
	}
	fmt.Printf("%s of steel, centroid %.4f in from the face\n", units.US.Format(fit.Area.Amount()), fit.Centroid.In(units.Inch))
	fmt.Printf("clear %.3f in, required %s; least width %s\n", fit.Horizontal().Clear.In(units.Inch), in(fit.Horizontal().Required), in(fit.LeastWidth))
	fmt.Println("fits:", fit.Fits(), " aligned:", fit.Aligned())
	// Output:
	// layer 1  #9  x 3.000  y 2.564 in
	// layer 1  #9  x 6.333  y 2.564 in
	// layer 1  #9  x 9.667  y 2.564 in
	// layer 1  #9  x 13.000  y 2.564 in
	// layer 2  #9  x 3.000  y 4.692 in
	// layer 2  #9  x 13.000  y 4.692 in
	// 6 in2 of steel, centroid 3.2733 in from the face
	// clear 2.205 in, required 1.128 in; least width 12.768 in
	// fits: true  aligned: true
}

func ExampleCatalog_Size() {
	catalog, err := bars.Lookup("csa-g30-18")
	if err != nil {
		log.Fatal(err)
	}
	s, err := catalog.Size("25M")
	fmt.Println(s, s.PrintedDiameter(), s.PrintedArea(), s.PrintedMass(), err)
	_, err = catalog.Size("24M")
	fmt.Println(err)
	// Output:
	// 25M 25.2 mm 500 mm2 3.925 kg/m <nil>
	// bars: no size "24M" in catalog csa-g30-18; nearest known "25M" (known: 10M, 15M, 20M, 25M, 30M, 35M, 45M, 55M)
}

func ExampleCage_MostInLayer() {
	catalog, err := bars.Lookup("en-10080")
	if err != nil {
		log.Fatal(err)
	}
	link, err := catalog.Size("10")
	if err != nil {
		log.Fatal(err)
	}
	cage := bars.Cage{Width: units.Millimetre.Of(290), SideCover: units.Millimetre.Of(30), FaceCover: units.Millimetre.Of(30), Stirrup: link}
	need := bars.Clearance{Least: units.Millimetre.Of(25), Diameters: 1}
	for _, s := range catalog.Sizes() {
		if s.Number < 20 {
			continue
		}
		cage.Corner = bars.Seated
		seated, err := cage.MostInLayer(s, need)
		if err != nil {
			log.Fatal(err)
		}
		cage.Corner = bars.Tucked
		tucked, err := cage.MostInLayer(s, need)
		if err != nil {
			log.Fatal(err)
		}
		fmt.Printf("%s mm: %d seated, %d tucked\n", s, seated, tucked)
	}
	// Output:
	// 20 mm: 4 seated, 5 tucked
	// 25 mm: 4 seated, 4 tucked
	// 28 mm: 4 seated, 4 tucked
	// 32 mm: 3 seated, 3 tucked
	// 40 mm: 3 seated, 3 tucked
}

func ExampleStirrupSet_Lengths() {
	catalog, err := bars.Lookup("astm-inch")
	if err != nil {
		log.Fatal(err)
	}
	four, err := catalog.Size("#4")
	if err != nil {
		log.Fatal(err)
	}
	set := bars.StirrupSet{Size: four, Form: bars.ClosedForm, Width: units.Inch.Of(13), Depth: units.Inch.Of(23), Legs: 4}
	l, err := set.Lengths()
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("stirrup %.2f in, %d cross ties of %.2f in, %.2f lb in all\n",
		l.Outer.In(units.Inch), l.Ties, l.Tie.In(units.Inch), four.Mass(l.Total).In(units.PoundMass))
	// Output:
	// stirrup 77.78 in, 2 cross ties of 30.91 in, 7.77 lb in all
}

func ExampleBundle() {
	catalog, err := bars.Lookup("astm-inch")
	if err != nil {
		log.Fatal(err)
	}
	four, err := catalog.Size("#4")
	if err != nil {
		log.Fatal(err)
	}
	three, err := catalog.Bundle("3x#8")
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("%s: %d bars %s, counts as one of %.3f in and %s\n",
		three, three.Bundled(), three.Single(), three.Diameter.In(units.Inch), three.PrintedArea())

	cage := bars.Cage{Width: units.Inch.Of(14), SideCover: units.Inch.Of(1.5), FaceCover: units.Inch.Of(1.5), Stirrup: four}
	need := bars.Clearances{InLayer: bars.Clearance{Least: units.Inch.Of(1), Diameters: 1}}
	fit, err := cage.Fit([]bars.Layer{{{Size: three, Count: 2}}}, need)
	if err != nil {
		log.Fatal(err)
	}
	for _, b := range fit.AppendSingles(nil) {
		fmt.Printf("%s  x %.3f  y %.3f in\n", b.Size, b.X.In(units.Inch), b.Y.In(units.Inch))
	}
	g := fit.Horizontal()
	fmt.Printf("centroid %.3f in; clear %.3f in, required %.3f in\n", fit.Centroid.In(units.Inch), g.Clear.In(units.Inch), g.Required.In(units.Inch))
	// Output:
	// 3x#8: 3 bars #8, counts as one of 1.732 in and 2.37 in2
	// #8  x 3.000  y 2.500 in
	// #8  x 4.000  y 2.500 in
	// #8  x 3.500  y 3.366 in
	// #8  x 10.000  y 2.500 in
	// #8  x 11.000  y 2.500 in
	// #8  x 10.500  y 3.366 in
	// centroid 2.789 in; clear 5.000 in, required 1.732 in
}

func ExampleCage_AppendLegs() {
	catalog, err := bars.Lookup("astm-inch")
	if err != nil {
		log.Fatal(err)
	}
	four, err := catalog.Size("#4")
	if err != nil {
		log.Fatal(err)
	}
	nine, err := catalog.Size("#9")
	if err != nil {
		log.Fatal(err)
	}
	cage := bars.Cage{Width: units.Inch.Of(24), SideCover: units.Inch.Of(1.5), FaceCover: units.Inch.Of(1.5), Stirrup: four}
	fit, err := cage.Fit([]bars.Layer{{{Size: nine, Count: 6}}}, bars.Clearances{})
	if err != nil {
		log.Fatal(err)
	}
	legs, held, err := cage.AppendLegs(nil, 4, fit.Bars)
	if err != nil {
		log.Fatal(err)
	}
	for _, x := range legs {
		fmt.Printf("%.3f in\n", x.In(units.Inch))
	}
	fmt.Printf("held: %t; widest apart: %.3f in\n", held, bars.WidestApart(legs).In(units.Inch))
	// Output:
	// 1.750 in
	// 9.386 in
	// 14.614 in
	// 22.250 in
	// held: true; widest apart: 7.636 in
}
