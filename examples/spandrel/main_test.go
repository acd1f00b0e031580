package main

import (
	"context"
	"fmt"
	"log"
	"os"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
	"soffit.example/examples/internal/golden"
	"soffit.example/units"
)

func TestOutput(t *testing.T) { golden.Check(t, "spandrel", run) }

// The snippet of the README.
func Example() {
	spandrel := beam.Brief{
		Section: beam.Section{
			Shape: beam.Ell, Width: units.Inch.Of(16), Depth: units.Inch.Of(28), FlangeThickness: units.Inch.Of(6),
			Slab: beam.Slab{ClearRight: units.Foot.Of(16)}, // the code finds the flange from the floor
		},
		Concrete:      beam.Concrete{Strength: units.PSI.Of(4000)},
		Reinforcement: beam.Reinforcement{Catalog: "astm-inch", Yield: units.KSI.Of(60)},
		Exposure:      beam.Interior,
		Spans:         []units.Length{units.Foot.Of(26)},
		Supports:      []beam.Support{{Kind: beam.Fixed, Width: units.Inch.Of(18)}, {Kind: beam.Fixed, Width: units.Inch.Of(18)}},
		Loads: []beam.Load{
			{Case: beam.Dead, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1.4)},
			{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(0.8)},
			// 2 kip-ft a foot: the moment is the total over the span.
			{Case: beam.Dead, Shape: beam.UniformTorque, Moment: units.KipFoot.Of(2 * 26), Path: beam.EquilibriumTorque},
		},
	}
	designed, err := beam.Design(context.Background(), aci318.ACI31819(), spandrel)
	if err != nil {
		log.Fatal(err)
	}
	in := designed.System // quantities print in SI units of their own accord; in those of the code through it
	fmt.Println(designed.Verdict)
	for _, zone := range designed.Layout.Transverse {
		fmt.Println(zone.Count, zone.Bar, "stirrups at", in.Format(zone.Spacing.Amount()))
	}
	for _, support := range designed.Reactions {
		fmt.Println("support", support.Support, "holds a torque of", beam.Short(in, support.Torque.Amount()))
	}
	// Output:
	// satisfied
	// 12 #3 stirrups at 7.5 in
	// 13 #3 stirrups at 9 in
	// 12 #3 stirrups at 7.5 in
	// support 1 holds a torque of 36.4 kip-ft
	// support 2 holds a torque of 36.4 kip-ft
}

func TestReadmeSnippetIsTheExample(t *testing.T) {
	readme, err := os.ReadFile("../../README.md")
	require.NoError(t, err)
	source, err := os.ReadFile("main_test.go")
	require.NoError(t, err)
	_, after, found := strings.Cut(string(readme), "```go\nspandrel :=")
	require.True(t, found)
	snippet, _, found := strings.Cut("spandrel :="+after, "```")
	require.True(t, found)
	for line := range strings.Lines(snippet) {
		require.Contains(t, string(source), strings.TrimSpace(line))
	}
}
