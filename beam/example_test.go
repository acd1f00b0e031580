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
		Supports:      []beam.Support{{Kind: statics.Pinned, Width: units.Inch.Of(12)}, {Kind: statics.Roller, Width: units.Inch.Of(12)}},
		Loads: []beam.Load{
			{Case: beam.Dead, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1.1)},
			{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1.3)},
		},
	}
	result, err := beam.Design(context.Background(), aci318.ACI31819(), brief)
	if err != nil {
		log.Fatal(err) // every fault of the brief at once, each with its field and the range allowed
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
