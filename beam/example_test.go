package beam_test

import (
	"context"
	"fmt"
	"log"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// The snippet of the README.
func Example() {
	brief := beam.Brief{
		Section:       beam.Section{Shape: beam.Rectangular, Width: units.Inch.Of(14), Depth: units.Inch.Of(24)},
		Concrete:      beam.Concrete{Strength: units.PSI.Of(4000)},
		Reinforcement: beam.Reinforcement{Catalog: "astm-inch", Yield: units.KSI.Of(60)},
		Exposure:      beam.Interior,
		Spans:         []units.Length{units.Foot.Of(22)},
		Supports:      []beam.Support{{Kind: beam.Pinned, Width: units.Inch.Of(12)}, {Kind: beam.Roller, Width: units.Inch.Of(12)}},
		Loads: []beam.Load{
			{Case: beam.Dead, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1.1)},
			{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1.3)},
		},
	}
	result, err := beam.Design(context.Background(), aci318.ACI31819(), brief)
	if err != nil {
		log.Fatal(err) // every fault of the brief at once, each with its field and the range allowed
	}
	if result.Verdict != beam.Satisfied {
		log.Fatal(result.Verdict, result.Binding, result.Refusals) // no error: the beam, not the input
	}
	fmt.Println(result.Verdict, "governed by", result.Governing.ID)
	for _, row := range result.Layout.Longitudinal {
		fmt.Println(row.Face, row.Count, row.Bar)
	}
	// Output:
	// satisfied governed by flexure.positive
	// bottom 6 #6
	// top 2 #3
}

// Factored forces from the caller's own analysis, in place of spans.
func ExampleDesign_demands() {
	brief := beam.Brief{
		Section:       beam.Section{Shape: beam.Rectangular, Width: units.Millimetre.Of(300), Depth: units.Millimetre.Of(600)},
		Concrete:      beam.Concrete{Strength: units.Megapascal.Of(30)},
		Reinforcement: beam.Reinforcement{Catalog: "astm-metric", Yield: units.Megapascal.Of(420)},
		Exposure:      beam.Interior,
		Demands: []beam.Demand{
			{Name: "span", Moment: units.KilonewtonMetre.Of(240), Shear: units.Kilonewton.Of(30)},
			{Name: "support", Moment: units.KilonewtonMetre.Of(-150), Shear: units.Kilonewton.Of(190)},
		},
		Preferences: beam.Preferences{Prefer: beam.FewestBars},
	}
	result, err := beam.Design(context.Background(), aci318.ACI31819M(), brief)
	if err != nil {
		log.Fatal(err)
	}
	fmt.Println(result.Verdict)
	for _, row := range result.Layout.Longitudinal {
		fmt.Println(row.Face, row.Count, row.Bar)
	}
	for _, zone := range result.Layout.Transverse {
		fmt.Println(zone.Legs, "legs of", zone.Bar, "at", units.SI.Format(zone.Spacing.Amount()))
	}
	// Output:
	// satisfied
	// bottom 2 No. 29
	// top 2 No. 22
	// 2 legs of No. 10 at 260 mm
}

// A layout from a drawing, judged: every check that fails says by how much
// and by which clause.
func ExampleCheckLayout() {
	brief := beam.Brief{
		Section:       beam.Section{Shape: beam.Rectangular, Width: units.Inch.Of(14), Depth: units.Inch.Of(24)},
		Concrete:      beam.Concrete{Strength: units.PSI.Of(4000)},
		Reinforcement: beam.Reinforcement{Catalog: "astm-inch", Yield: units.KSI.Of(60)},
		Exposure:      beam.Interior,
		Spans:         []units.Length{units.Foot.Of(22)},
		Supports:      []beam.Support{{Kind: statics.Pinned, Width: units.Inch.Of(12)}, {Kind: statics.Roller, Width: units.Inch.Of(12)}},
		Loads:         []beam.Load{{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(2.5)}},
	}
	drawn := beam.Layout{
		Longitudinal: []beam.Row{
			{Mark: "A", Bar: "#8", Count: 3, Face: beam.Bottom, Layer: 1},
			{Mark: "B", Bar: "#5", Count: 2, Face: beam.Top, Layer: 1},
		},
		Transverse: []beam.Zone{
			{Mark: "C", Bar: "#3", Legs: 2, Spacing: units.Inch.Of(10), From: units.Inch.Of(6), To: units.Inch.Of(258)},
		},
	}
	result, err := beam.CheckLayout(context.Background(), aci318.ACI31819(), brief, drawn)
	if err != nil {
		log.Fatal(err)
	}
	fmt.Println(result.Verdict)
	for i := range result.Checks {
		if c := &result.Checks[i]; c.Outcome == beam.Fail {
			fmt.Printf("%s: %.2f of what %s allows\n", c.ID, c.Utilization, c.Clause)
		}
	}
	// Output:
	// unsatisfied
	// flexure.positive: 1.25 of what 9.5.1.1 allows
}
