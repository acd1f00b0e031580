// Quickstart designs one beam with the library and prints the design for
// reading in a terminal: loads and combinations, the bars, a drawing of the
// section, every check with its utilization and clause, what was assumed and
// what became of it, what was rejected and why, and the cautions.
//
// The beam carries the gallery floor of a seed archive: racks of drawers over
// most of the span and a hoist beam at one point.
package main

import (
	"context"
	"fmt"
	"io"
	"os"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
	"soffit.example/units"
)

func main() {
	if err := run(os.Stdout); err != nil {
		fmt.Fprintln(os.Stderr, err)
		os.Exit(1)
	}
}

// brief is the job as the engineer has it.
func brief() beam.Brief {
	return beam.Brief{
		Reference: "G-4, seed archive gallery",
		Section:   beam.Section{Shape: beam.Rectangular, Width: units.Inch.Of(15), Depth: units.Inch.Of(25)},
		Concrete: beam.Concrete{
			Strength: units.PSI.Of(4500), Density: units.PoundPerCubicFoot.Of(150), Aggregate: units.Inch.Of(0.75),
		},
		Reinforcement: beam.Reinforcement{Catalog: "astm-inch", Yield: units.KSI.Of(60)},
		Exposure:      beam.Interior,
		Spans:         []units.Length{units.Foot.Of(25)},
		Supports: []beam.Support{
			{Kind: beam.Pinned, Width: units.Inch.Of(14)},
			{Kind: beam.Roller, Width: units.Inch.Of(14)},
		},
		Loads: []beam.Load{
			{Case: beam.Dead, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(0.95)},
			{Case: beam.Live, Shape: beam.Partial, From: units.Foot.Of(3), To: units.Foot.Of(25), Intensity: units.KipPerFoot.Of(1.7), Sustained: 0.6},
			{Case: beam.Live, Shape: beam.PointLoad, At: units.Foot.Of(11), Force: units.Kip.Of(6)},
		},
		Serviceability: beam.Serviceability{Attached: beam.Robust, Months: 60},
		Preferences: beam.Preferences{
			Bars: []string{"#5", "#6", "#7", "#8", "#9"}, Stirrups: []string{"#3", "#4"}, Prefer: beam.LeastSteel,
		},
	}
}

func run(w io.Writer) error {
	result, err := beam.Design(context.Background(), aci318.ACI31819(), brief())
	if err != nil {
		return err
	}
	p := printer{w: w, sys: result.System}
	p.result(result)
	return p.err
}
