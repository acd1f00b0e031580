package main

import (
	"bytes"
	"flag"
	"fmt"
	"log"
	"os"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
	"soffit.example/units"
)

var update = flag.Bool("update", false, "rewrite the golden file")

func TestOutput(t *testing.T) {
	const golden = "../../testdata/examples/strengths.txt"
	var out bytes.Buffer
	require.NoError(t, run(&out))
	if *update {
		require.NoError(t, os.WriteFile(golden, out.Bytes(), 0o644))
	}
	want, err := os.ReadFile(golden)
	require.NoError(t, err)
	require.Equal(t, string(want), out.String())
}

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
