package main

import (
	"fmt"
	"io"
	"math"
	"strings"

	"soffit.example/beam"
	"soffit.example/units"
)

// printer writes a result as plain text and remembers the first error.
type printer struct {
	w   io.Writer
	sys units.System
	err error
}

func (p *printer) line(format string, args ...any) {
	if p.err == nil {
		_, p.err = fmt.Fprintf(p.w, format+"\n", args...)
	}
}

func (p *printer) head(title string) {
	p.line("\n%s\n%s", title, strings.Repeat("-", len(title)))
}

func (p *printer) result(r *beam.Result) {
	p.line("%s\n%s by %s: %s", r.Reference, r.Code, r.Engine.Name, r.Verdict)
	if g := r.Governing; g != nil {
		p.line("governed by %s at %.0f %% of what %s allows", g.ID, 100*g.Utilization, g.Clause)
	}
	p.loads(r)
	p.layout(r)
	p.section(r)
	p.checks(r)
	p.assumptions(r)
	p.rejects(r)
	p.head("Cautions")
	for _, c := range r.Cautions {
		p.line("* %s", c)
	}
}

func (p *printer) loads(r *beam.Result) {
	p.head("Loads and combinations")
	for _, l := range r.Problem.Brief.Loads {
		switch l.Shape {
		case beam.Uniform:
			p.line("%-6s %s along the span", l.Case, p.sys.Format(l.Intensity.Amount()))
		case beam.Partial:
			p.line("%-6s %s from %s to %s", l.Case, p.sys.Format(l.Intensity.Amount()), p.feet(l.From), p.feet(l.To))
		case beam.PointLoad:
			p.line("%-6s %s at %s", l.Case, p.sys.Format(l.Force.Amount()), p.feet(l.At))
		}
	}
	p.line("%-6s %s of self-weight", beam.Dead, p.sys.Format(r.Problem.SelfWeight.Amount()))
	for _, s := range r.Reactions {
		p.line("support %d holds up to %s (%s)", s.Support, p.round(s.Most.Amount()), s.MostBy)
	}
	for _, c := range r.Kept {
		p.line("used:    %s (%s)", c.ID, c.Clause)
	}
	for _, c := range r.Dropped {
		p.line("dropped: %s (%s): %s", c.ID, c.Clause, c.Reason)
	}
}

// feet prints a position along the beam, to a hundredth of a foot or to a
// millimetre.
func (p *printer) feet(l units.Length) string {
	if p.sys == units.US {
		return fmt.Sprintf("%.2f ft", l.In(units.Foot))
	}
	return fmt.Sprintf("%.0f mm", l.In(units.Millimetre))
}

func (p *printer) layout(r *beam.Result) {
	p.head("Bars")
	for _, row := range r.Layout.Longitudinal {
		use := ""
		if row.InCompression {
			use = ", relied on in compression"
		}
		p.line("%-3s %d %s, %s, layer %d%s", row.Mark, row.Count, row.Bar, row.Face, row.Layer, use)
	}
	for _, z := range r.Layout.Transverse {
		p.line("%-3s %d %s stirrups of %d legs at %s, from %s to %s",
			z.Mark, z.Count, z.Bar, z.Legs, p.sys.Format(z.Spacing.Amount()), p.feet(z.From), p.feet(z.To))
	}
	q := r.Quantities
	p.line("steel %s (stirrups %s), concrete %s", p.round(q.SteelMass.Amount()), p.round(q.StirrupMass.Amount()), p.round(q.Concrete.Amount()))
	for _, a := range r.Alternatives {
		p.line("next best: %s: %s", bottomBars(&a.Layout), a.WhyNotFirst)
	}
}

func bottomBars(l *beam.Layout) string {
	var rows []string
	for _, row := range l.Longitudinal {
		if row.Face == beam.Bottom {
			rows = append(rows, fmt.Sprintf("%d %s", row.Count, row.Bar))
		}
	}
	return strings.Join(rows, " + ") + " at the bottom"
}

// round prints an amount to three figures, for reading.
func (p *printer) round(a units.Amount) string {
	v := p.sys.Float(a)
	if a.Dimension() == units.None {
		return fmt.Sprintf("%.3g", v)
	}
	digits := 0
	if v != 0 {
		digits = max(0, 2-int(math.Floor(math.Log10(math.Abs(v)))))
	}
	return strings.TrimSpace(fmt.Sprintf("%.*f %s", digits, v, p.sys.Unit(a.Dimension())))
}

func (p *printer) checks(r *beam.Result) {
	p.head("Checks")
	for i := range r.Checks {
		c := &r.Checks[i]
		switch c.Outcome {
		case beam.Pass, beam.Fail:
			p.line("%5.2f  %-4s %-28s %s of %s  (%s)", c.Utilization, c.Outcome, name(c), p.round(c.Demand), p.round(c.Capacity), c.Clause)
		default:
			p.line("    -  %s: %s (%s)", name(c), c.Outcome, c.Clause)
		}
	}
}

// name is a check's id with its face, where it has one.
func name(c *beam.Check) string {
	if c.Face == 0 {
		return c.ID
	}
	return c.ID + " " + c.Face.String()
}

func (p *printer) assumptions(r *beam.Result) {
	p.head("Assumptions")
	for _, a := range r.Assumptions {
		state := "refuted"
		switch {
		case a.Open:
			state = "to confirm"
		case a.Holds:
			state = "holds"
		}
		p.line("%-10s %s", state, a.Assumed)
		if a.Found != "" {
			p.line("           found: %s", a.Found)
		}
	}
}

// mostRejects is how many rejected arrangements are worth a reader's time.
const mostRejects = 12

func (p *printer) rejects(r *beam.Result) {
	p.head(fmt.Sprintf("Rejected (%d arrangements)", len(r.Rejected)))
	for i, rej := range r.Rejected {
		if i == mostRejects {
			p.line("... and %d more", len(r.Rejected)-mostRejects)
			return
		}
		p.line("%s", rej.Arrangement.Describe(p.sys))
		for j := range rej.Failed {
			c := &rej.Failed[j]
			p.line("    %s: %s asked of %s (%s)", c.ID, p.round(c.Demand), p.round(c.Capacity), c.Clause)
		}
	}
}
