// Strengths compares one tee in both senses of bending, with and without the
// bars on its compression side, and prints why the strengths differ: where
// the stress block lies, what the strain of the bars makes of φ, and what the
// least steel goes by. A second table widens the flange from nothing.
//
// The tee is a beam of the slipway floor of a boathouse: it sags between
// columns and hogs over them.
package main

import (
	"bytes"
	"errors"
	"fmt"
	"io"
	"os"
	"slices"
	"text/tabwriter"

	"soffit.example/bars"
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

// tee is the beam with a flange of a width; as wide as the web it has none.
func tee(flange units.Length) beam.Section {
	return beam.Section{
		Shape: beam.Tee, Width: units.Inch.Of(12), Depth: units.Inch.Of(26),
		FlangeThickness: units.Inch.Of(4), FlangeWidth: flange,
	}
}

// steel is like bars of one face: how many, and how deep from the top.
type steel struct {
	count int
	depth units.Length
}

var (
	bottom = steel{4, units.Inch.Of(23.5)}
	top    = steel{8, units.Inch.Of(2.5)} // two in the web, the others beside it
)

// study asks for strengths of the tee with bars of one size.
type study struct {
	out bytes.Buffer
	bar bars.Size
}

// strength is the strength in one sense, by the bars on the tension side
// alone or with those on the other side too.
func (s *study) strength(section beam.Section, sense beam.Sense, both bool) (beam.Strengths, error) {
	steel := []steel{bottom, top}
	if sense == beam.Negative {
		slices.Reverse(steel)
	}
	if !both {
		steel = steel[:1]
	}
	q := beam.SectionQuery{Section: section, Concrete: beam.Concrete{Strength: units.PSI.Of(4000), Kind: beam.Normalweight}, Bending: sense}
	for _, l := range steel {
		q.Layers = append(q.Layers, beam.SteelLayer{
			Area: bars.TotalArea(bars.Group{Size: s.bar, Count: l.count}), Depth: l.depth, Yield: units.KSI.Of(60),
		})
	}
	found, err := aci318.ACI31819().Strengths(q)
	if err == nil && len(found.Refusals) > 0 {
		err = errors.New(found.Refusals[0].Detail)
	}
	return found, err
}

func run(w io.Writer) error {
	catalog, err := bars.Lookup("astm-inch")
	if err != nil {
		return err
	}
	var s study
	if s.bar, err = catalog.Size("#9"); err != nil {
		return err
	}
	if err := s.compare(); err != nil {
		return err
	}
	if err := s.widen(); err != nil {
		return err
	}
	_, err = s.out.WriteTo(w)
	return err
}

// compare prints the strengths of the beam in both senses, by the bars in
// tension alone and by all, with the reasons.
func (s *study) compare() error {
	section, web := tee(units.Inch.Of(60)), tee(units.Inch.Of(12))
	t := tabwriter.NewWriter(&s.out, 0, 0, 2, ' ', 0)
	fmt.Fprintln(t, "case\tbending\tbars\ta in\tεt\tφ\tφMn kip-ft\tAs in2\tleast in2")
	var reasons, notes []string
	for _, sense := range []beam.Sense{beam.Positive, beam.Negative} {
		alone, err := s.strength(web, sense, false)
		if err != nil {
			return err
		}
		for _, both := range []bool{false, true} {
			found, err := s.strength(section, sense, both)
			if err != nil {
				return err
			}
			which := "tension side"
			if both {
				which = "both sides"
			}
			f := &found.Flexure
			name := string(rune('A' + len(reasons)))
			fmt.Fprintf(t, "%s\t%s\t%s\t%.2f\t%.4f\t%.3f\t%.1f\t%.2f\t%.2f\n", name, sense, which, f.BlockDepth.In(units.Inch), f.ExtremeStrain, f.Phi,
				f.Design.In(units.KipFoot), f.TensionSteel.In(units.SquareInch), f.MinimumSteel.In(units.SquareInch))
			reasons = append(reasons, fmt.Sprintf("%s: %s; %s;%s least steel %s.", name, block(&section, f), class(f), others(f), least(f, &alone.Flexure)))
			for _, n := range found.Notes {
				if !slices.Contains(notes, n) {
					notes = append(notes, n)
				}
			}
		}
	}
	if err := t.Flush(); err != nil {
		return err
	}
	for _, r := range reasons {
		fmt.Fprintln(&s.out, r)
	}
	for _, n := range notes {
		fmt.Fprintln(&s.out, "note:", n)
	}
	return nil
}

// block says where the concrete is pressed.
func block(s *beam.Section, f *beam.FlexureStrength) string {
	switch {
	case f.Sense == beam.Negative:
		return "the block lies at the bottom, in the web"
	case f.BlockDepth.AtMost(s.FlangeThickness):
		return "the block lies in the flange, as in a beam that is so wide all the way down"
	}
	return "the block reaches through the flange into the web"
}

// class says what the strain of the outermost bars makes of φ.
func class(f *beam.FlexureStrength) string {
	if f.ExtremeStrain < f.LeastStrain {
		return fmt.Sprintf("%s: φ falls to %.3f, and εt is below the %.4f that 9.3.3.1 asks of beams", f.Class, f.Phi, f.LeastStrain)
	}
	return f.Class
}

// others says what the bars on the other side do.
func others(f *beam.FlexureStrength) string {
	switch {
	case len(f.Layers) == 1:
		return ""
	case f.Layers[1].Strain > 0:
		return " the other bars lie below the neutral axis and are pulled as well, on a short arm;"
	}
	return fmt.Sprintf(" the other bars take %.0f kip of the compression, so that the block is shallower;", f.Layers[1].Force.Abs().In(units.Kip))
}

// least says what the least steel is against that of the web alone.
func least(f, alone *beam.FlexureStrength) string {
	if ratio := f.MinimumSteel.Ratio(alone.MinimumSteel); ratio > 1.001 {
		return fmt.Sprintf("%.3g times that of the web alone", ratio)
	}
	return "that of the web alone"
}

// widen prints what the width of the flange does in each sense: sagging by
// the bars in tension alone, hogging by all.
func (s *study) widen() error {
	t := tabwriter.NewWriter(&s.out, 0, 0, 2, ' ', 0)
	fmt.Fprintln(t, "\nflange in\tsagging φMn\ta in\tleast in2\tblock within\thogging φMn\ta in\tleast in2\tblock within")
	for _, width := range []float64{12, 14, 16, 18, 20, 24, 36, 60} {
		fmt.Fprintf(t, "%g", width)
		section := tee(units.Inch.Of(width))
		for _, sense := range []beam.Sense{beam.Positive, beam.Negative} {
			found, err := s.strength(section, sense, sense == beam.Negative)
			if err != nil {
				return err
			}
			f := &found.Flexure
			within := "web"
			if sense == beam.Positive && f.BlockDepth.AtMost(section.FlangeThickness) {
				within = "flange"
			}
			fmt.Fprintf(t, "\t%.1f\t%.2f\t%.2f\t%s", f.Design.In(units.KipFoot), f.BlockDepth.In(units.Inch), f.MinimumSteel.In(units.SquareInch), within)
		}
		fmt.Fprintln(t)
	}
	return t.Flush()
}
