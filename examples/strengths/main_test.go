package main

import (
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

func TestOutput(t *testing.T) { golden.Check(t, "strengths", run) }

// The snippet of the README.
func Example() {
	tee := beam.Section{
		Shape: beam.Tee, Width: units.Inch.Of(12), Depth: units.Inch.Of(26),
		FlangeThickness: units.Inch.Of(4), FlangeWidth: units.Inch.Of(60),
	}
	found, err := aci318.ACI31819().Strengths(beam.SectionQuery{
		Section:  tee,
		Concrete: beam.Concrete{Strength: units.PSI.Of(4000)},
		Bending:  beam.Negative, // hogging: the flange is in tension
		Layers: []beam.SteelLayer{
			{Area: units.SquareInch.Of(8), Depth: units.Inch.Of(2.5), Yield: units.KSI.Of(60)},
			{Area: units.SquareInch.Of(4), Depth: units.Inch.Of(23.5), Yield: units.KSI.Of(60)},
		},
	})
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("%s, φMn = %.0f kip-ft\n", found.Flexure.Class, found.Flexure.Design.In(units.KipFoot))
	// Output: tension-controlled, φMn = 742 kip-ft
}

func TestReadmeSnippetIsTheExample(t *testing.T) {
	readme, err := os.ReadFile("../../README.md")
	require.NoError(t, err)
	source, err := os.ReadFile("main_test.go")
	require.NoError(t, err)
	_, after, found := strings.Cut(string(readme), "```go\ntee :=")
	require.True(t, found)
	snippet, _, found := strings.Cut("tee :="+after, "```")
	require.True(t, found)
	for line := range strings.Lines(snippet) {
		require.Contains(t, string(source), strings.TrimSpace(line))
	}
}
