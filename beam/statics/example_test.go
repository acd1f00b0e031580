package statics_test

import (
	"fmt"
	"math"

	"soffit.example/beam/statics"
	"soffit.example/units"
)

// A simple beam of 24 ft under dead and live load: its strongest moment and
// shear over two combinations.
func Example() {
	beam := statics.Beam{
		Spans:    []statics.Span{{Length: units.Foot.Of(24)}},
		Supports: []statics.Support{{Kind: statics.Pinned}, {Kind: statics.Roller}},
	}
	response, err := statics.Analyze(beam, []statics.Load{
		{ID: "floor", Case: "dead", Shape: statics.Uniform{Intensity: units.KipPerFoot.Of(1)}},
		{ID: "floor", Case: "live", Shape: statics.Uniform{Intensity: units.KipPerFoot.Of(1.5)}},
		{ID: "stair", Case: "live", Shape: statics.Point{Force: units.Kip.Of(10), At: units.Foot.Of(6)}},
	})
	if err != nil {
		fmt.Println(err)
		return
	}
	factored, err := response.Combine([]statics.Combination{
		{ID: "1.4D", Factors: []statics.Factor{{Case: "dead", Value: 1.4}}},
		{ID: "1.2D + 1.6L", Factors: []statics.Factor{{Case: "dead", Value: 1.2}, {Case: "live", Value: 1.6}}},
	})
	if err != nil {
		fmt.Println(err)
		return
	}
	lines, err := factored.Lines(1)
	if err != nil {
		fmt.Println(err)
		return
	}
	e, err := lines.Extremes(units.Foot.Of(0), lines.Length())
	if err != nil {
		fmt.Println(err)
		return
	}
	for _, f := range []statics.Forces{e.MomentMost, e.ShearMost, e.ShearLeast} {
		fmt.Printf("%s at %s: M = %s, V = %s\n", f.ID, units.Foot.Format(f.At),
			units.US.Format(f.Moment.Amount()), units.US.Format(f.Shear.Amount()))
	}
	// Output:
	// 1.2D + 1.6L at 10.8888888889 ft: M = 309.422222222 kip-ft, V = 0 kip
	// 1.2D + 1.6L at 0 ft: M = 0 kip-ft, V = 55.2 kip
	// 1.2D + 1.6L at 24 ft: M = 0 kip-ft, V = -47.2 kip
}

// The moment and the shear that act together, under every line in turn: at a
// point load the two sides differ.
func ExampleLines_All() {
	response, err := statics.Analyze(statics.Beam{
		Spans:    []statics.Span{{Length: units.Metre.Of(6)}},
		Supports: []statics.Support{{Kind: statics.Pinned}, {Kind: statics.Roller}},
	}, []statics.Load{
		{Case: "crane", Shape: statics.Point{Force: units.Kilonewton.Of(90), At: units.Metre.Of(2)}},
		{Case: "brake", Shape: statics.Couple{Moment: units.KilonewtonMetre.Of(12), At: units.Metre.Of(2)}},
	})
	if err != nil {
		fmt.Println(err)
		return
	}
	lines, err := response.Lines(1)
	if err != nil {
		fmt.Println(err)
		return
	}
	for _, line := range lines.All() {
		left, right, err := line.At(units.Metre.Of(2))
		if err != nil {
			fmt.Println(err)
			return
		}
		for _, f := range []statics.Forces{left, right} {
			fmt.Printf("%s, %v: M = %s, V = %s\n", f.ID, f.Side,
				units.SI.Format(f.Moment.Amount()), units.SI.Format(f.Shear.Amount()))
		}
	}
	// Output:
	// crane, left: M = 120 kN-m, V = 60 kN
	// crane, right: M = 120 kN-m, V = -30 kN
	// brake, left: M = -4 kN-m, V = -2 kN
	// brake, right: M = 8 kN-m, V = -2 kN
}

// A fixed beam under a uniform load bends the other way beyond the inflection
// points, 0.2113 of the span from each end.
func ExampleLine_AppendInflections() {
	response, err := statics.Analyze(statics.Beam{
		Spans:    []statics.Span{{Length: units.Metre.Of(10)}},
		Supports: []statics.Support{{Kind: statics.Fixed}, {Kind: statics.Fixed}},
	}, []statics.Load{
		{Case: "dead", Shape: statics.Uniform{Intensity: units.KilonewtonPerMetre.Of(12)}},
	})
	if err != nil {
		fmt.Println(err)
		return
	}
	lines, err := response.Lines(1)
	if err != nil {
		fmt.Println(err)
		return
	}
	line, err := lines.Line("dead")
	if err != nil {
		fmt.Println(err)
		return
	}
	for _, x := range line.AppendInflections(nil) {
		fmt.Printf("%.4f m\n", x.In(units.Metre))
	}
	reactions, err := response.Reactions("dead")
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println(math.Round(reactions[0].Force.In(units.Kilonewton)), "kN,",
		math.Round(reactions[0].Moment.In(units.KilonewtonMetre)), "kN-m")
	// Output:
	// 2.1132 m
	// 7.8868 m
	// 60 kN, -100 kN-m
}

// A beam that can move is refused, and the motion named.
func ExampleAnalyze_mechanism() {
	_, err := statics.Analyze(statics.Beam{
		Spans:    []statics.Span{{Length: units.Metre.Of(6)}},
		Supports: []statics.Support{{Kind: statics.Roller}, {Kind: statics.Free}},
	}, []statics.Load{
		{Case: "dead", Shape: statics.Uniform{Intensity: units.KilonewtonPerMetre.Of(12)}},
	})
	fmt.Println(err)
	// Output:
	// supports: the beam is a mechanism: it turns about support 1 (roller), because support 2 is free
}
