// Spandrel designs the edge beam of a floor for the torque of what overhangs
// it, twice: once as a torque that nothing else can carry, once as one that
// comes from the twist which the floor imposes and may be shed to it. It
// prints the bars and stirrups of both, what torsion asks of the section and
// of the stirrups, what the columns are given, and what the floor must take.
//
// The beam stands at the edge of a drying loft. Its racks hang on brackets
// outside it, and the floor frames into it on the other side.
package main

import (
	"bytes"
	"context"
	"fmt"
	"io"
	"os"
	"strings"

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

// spandrel is the beam with a torque of one origin.
func spandrel(path beam.TorquePath) beam.Brief {
	const span = 26 // ft
	return beam.Brief{
		Reference: "E-2, edge of the drying loft",
		Section: beam.Section{
			Shape: beam.Ell, Width: units.Inch.Of(16), Depth: units.Inch.Of(28), FlangeThickness: units.Inch.Of(6),
			Slab: beam.Slab{ClearRight: units.Foot.Of(16)}, // the code finds the flange from the floor
		},
		Concrete:      beam.Concrete{Strength: units.PSI.Of(4000)},
		Reinforcement: beam.Reinforcement{Catalog: "astm-inch", Yield: units.KSI.Of(60)},
		Exposure:      beam.Interior,
		Spans:         []units.Length{units.Foot.Of(span)},
		Supports:      []beam.Support{{Kind: beam.Fixed, Width: units.Inch.Of(18)}, {Kind: beam.Fixed, Width: units.Inch.Of(18)}},
		Loads: []beam.Load{
			{Case: beam.Dead, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1.4)},
			{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(0.8)},
			// 2 and 1.2 kip-ft a foot, in all over the span.
			{Case: beam.Dead, Shape: beam.UniformTorque, Moment: units.KipFoot.Of(2 * span), Path: path},
			{Case: beam.Live, Shape: beam.UniformTorque, Moment: units.KipFoot.Of(1.2 * span), Path: path},
		},
		Preferences: beam.Preferences{Bars: []string{"#5", "#6", "#7", "#8"}, Prefer: beam.FewestMarks},
	}
}

func run(w io.Writer) error {
	var out bytes.Buffer
	for _, path := range []beam.TorquePath{beam.EquilibriumTorque, beam.CompatibilityTorque} {
		result, err := beam.Design(context.Background(), aci318.ACI31819(), spandrel(path))
		if err != nil {
			return err
		}
		fmt.Fprintf(&out, "torque of %s: %s, governed by %s at %.2f\n", path, result.Verdict, result.Governing.ID, result.Governing.Utilization)
		report(&out, result)
	}
	_, err := out.WriteTo(w)
	return err
}

func report(w io.Writer, r *beam.Result) {
	short := func(a interface{ Amount() units.Amount }) string { return beam.Short(r.System, a.Amount()) }
	for _, row := range r.Layout.Longitudinal {
		where := ""
		switch {
		case row.Face == beam.Side:
			where = " each"
		case row.Flange:
			where = ", in the flange"
		}
		fmt.Fprintf(w, "  %-6s %d %s%s\n", row.Face, row.Count, row.Bar, where)
	}
	for _, z := range r.Layout.Transverse {
		fmt.Fprintf(w, "  %d %s stirrups of %d legs at %s\n", z.Count, z.Bar, z.Legs, short(z.Spacing))
	}
	for i := range r.Checks {
		switch c := &r.Checks[i]; c.ID {
		case "torsion.section", "torsion.transverse":
			fmt.Fprintf(w, "  %s\n", c.Describe(r.System))
		}
	}
	for _, s := range r.Reactions {
		fmt.Fprintf(w, "  support %d is given %s and a torque of %s\n", s.Support, short(s.Most), short(s.Torque))
	}
	for _, a := range r.Assumptions {
		if strings.HasPrefix(a.ID, "torsion.") && a.Found != "" {
			fmt.Fprintf(w, "  assumed: %s; found: %s\n", a.Assumed, a.Found)
		}
	}
}
