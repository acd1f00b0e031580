// Checks puts a layout from an existing drawing to every check of ACI 318M-19
// and prints what fails, with the working of the governing check.
//
// The beam carries the potting floor of a glasshouse. The drawing shows its
// bars; the question is whether a heavier floor load than it was drawn for
// can be accepted.
package main

import (
	"context"
	"fmt"
	"io"
	"os"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
	"soffit.example/beam/working"
	"soffit.example/units"
)

func main() {
	if err := run(os.Stdout); err != nil {
		fmt.Fprintln(os.Stderr, err)
		os.Exit(1)
	}
}

// brief is the beam under a uniform live load.
func brief(live units.LineLoad) beam.Brief {
	return beam.Brief{
		Reference:     "P2, glasshouse potting floor",
		Section:       beam.Section{Shape: beam.Rectangular, Width: units.Millimetre.Of(320), Depth: units.Millimetre.Of(560)},
		Concrete:      beam.Concrete{Strength: units.Megapascal.Of(30), Aggregate: units.Millimetre.Of(20)},
		Reinforcement: beam.Reinforcement{Catalog: "astm-metric", Yield: units.Megapascal.Of(420)},
		Exposure:      beam.Weather,
		Spans:         []units.Length{units.Metre.Of(6.6)},
		Supports: []beam.Support{
			{Kind: beam.Pinned, Width: units.Millimetre.Of(300)},
			{Kind: beam.Roller, Width: units.Millimetre.Of(300)},
		},
		Loads: []beam.Load{
			{Case: beam.Dead, Shape: beam.Uniform, Intensity: units.KilonewtonPerMetre.Of(14)},
			{Case: beam.Live, Shape: beam.Uniform, Intensity: live, Sustained: 0.3},
		},
		Serviceability: beam.Serviceability{Attached: beam.NothingAttached},
	}
}

// drawn is what the drawing shows.
func drawn() beam.Layout {
	mm := units.Millimetre.Of
	end, third := mm(6600-150), mm(2100)
	return beam.Layout{
		Longitudinal: []beam.Row{
			{Mark: "1", Bar: "No. 25", Count: 3, Face: beam.Bottom, Layer: 1},
			{Mark: "2", Bar: "No. 16", Count: 2, Face: beam.Top, Layer: 1},
		},
		Transverse: []beam.Zone{
			{Mark: "3", Span: 1, Bar: "No. 10", Legs: 2, Spacing: mm(150), From: mm(150), To: third},
			{Mark: "3", Span: 1, Bar: "No. 10", Legs: 2, Spacing: mm(220), From: third, To: mm(4500)},
			{Mark: "3", Span: 1, Bar: "No. 10", Legs: 2, Spacing: mm(150), From: mm(4500), To: end},
		},
	}
}

func run(w io.Writer) error {
	for _, live := range []float64{16, 24} {
		result, err := beam.CheckLayout(context.Background(), aci318.ACI31819M(), brief(units.KilonewtonPerMetre.Of(live)), drawn())
		if err != nil {
			return err
		}
		if err := report(w, live, result); err != nil {
			return err
		}
	}
	return nil
}

func report(w io.Writer, live float64, r *beam.Result) error {
	if _, err := fmt.Fprintf(w, "live load %g kN/m: %s\n", live, r.Verdict); err != nil {
		return err
	}
	for i := range r.Checks {
		c := &r.Checks[i]
		if c.Outcome == beam.Fail {
			if _, err := fmt.Fprintf(w, "  fails: %s\n", c.Describe(r.System)); err != nil {
				return err
			}
		}
	}
	g := r.Governing
	if _, err := fmt.Fprintf(w, "  governed by %s at %.2f; its working:\n", g.ID, g.Utilization); err != nil {
		return err
	}
	for _, l := range working.Lines(g, r.System) {
		value := l.Value.Number.String() + " " + l.Value.Unit
		if l.Substitution != "" {
			value = l.Substitution + " = " + value
		}
		if l.Expression != "" && l.Substitution != "" {
			value = l.Expression + " = " + value
		}
		if l.Clause != "" {
			value += "  (" + l.Clause + ")"
		}
		if l.Note != "" {
			value += "  " + l.Note
		}
		if _, err := fmt.Fprintf(w, "    %-4s = %s\n", l.Symbol, value); err != nil {
			return err
		}
	}
	return nil
}
