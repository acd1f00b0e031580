package beam

import (
	"errors"
	"fmt"
	"slices"

	"soffit.example/bars"
	"soffit.example/units"
)

// outOfScope is the result of a problem that a scope rule refuses.
func (p *prepared) outOfScope() *Result {
	r := p.blank()
	r.Verdict = OutOfScope
	r.Refusals = p.refusals
	r.Assumptions = p.register.All()
	r.Cautions = p.cautions(r)
	return r
}

func (p *prepared) blank() *Result {
	return &Result{
		Engine: Engine{Name: "soffit", Version: Version}, Code: p.Code.Edition().ID, Reference: p.Brief.Reference,
		System: p.System, Problem: p.Problem, Section: p.Brief.Section, Kept: p.Kept, Dropped: p.Dropped,
	}
}

// finish judges a layout in full: every group of checks with its working,
// the assumptions against what was found, schedule and quantities. Design
// and CheckLayout both end here. The error is an *InputError for a layout
// that makes no sense for the problem, or the code's own.
func (p *prepared) finish(layout Layout) (*Result, error) {
	t, faults := trialOf(p.Problem, &layout)
	if len(faults) > 0 {
		return nil, &InputError{Faults: faults}
	}
	t.Record = true
	r := p.blank()
	r.Layout = layout
	r.Layout.Transverse = slices.Clone(t.Zones)
	r.Cover = t.Cover
	r.Checks = t.appendChecks(nil)
	register := p.register.clone()
	p.settle(t, &register)
	p.Code.Settle(t, r.Checks, &register)
	r.Assumptions = register.All()

	r.Verdict = Satisfied
	if Failing(r.Checks) || !judgedStrength(r.Checks) {
		r.Verdict = Unsatisfied
	}
	for _, a := range r.Assumptions {
		if a.Decisive && !a.Holds && !a.Open {
			r.Verdict = Unsatisfied
			r.Binding = append(r.Binding, a.ID)
		}
	}
	for i := range r.Checks {
		if c := &r.Checks[i]; c.Outcome == Fail && !slices.Contains(r.Binding, c.ID) {
			r.Binding = append(r.Binding, c.ID)
		}
	}
	r.Governing = Governing(r.Checks)
	if err := r.strengths(p, t); err != nil {
		return nil, err
	}
	r.Reactions = p.Forces.Reactions()
	r.Bars = t.positions(&layout)
	r.takeOff(t)
	r.Cautions = p.cautions(r)
	return r, nil
}

// strengths gives the flexural strength of the final bars in each sense that
// has tension steel, with the second route beside the first.
func (r *Result) strengths(p *prepared, t *Trial) error {
	for _, sense := range [2]Sense{Positive, Negative} {
		if !p.bent(sense) || t.Steel(sense.TensionFace()).Count == 0 {
			continue
		}
		b := &t.Brief
		if !t.inside(sense) {
			continue // a check says so; there is no strength to give
		}
		q := SectionQuery{Section: b.Section.bare(), Concrete: b.Concrete, Bending: sense, Readings: b.Readings}
		for _, l := range t.WithinSpread(sense.TensionFace(), t.Layers(sense, units.Stress{})) {
			q.Layers = append(q.Layers, SteelLayer{Area: l.Area, Depth: l.Depth, Yield: l.Steel.Yield})
		}
		found, err := p.Code.Strengths(q)
		switch {
		case errors.Is(err, ErrNotOffered):
			return nil
		case err != nil:
			return fmt.Errorf("beam: strength of the finished section: %w", err)
		case len(found.Refusals) > 0:
			continue // a check says so
		}
		r.Flexure = append(r.Flexure, found.Flexure)
	}
	return nil
}

// inside reports whether the bars of a sense lie in the section at all.
func (t *Trial) inside(sense Sense) bool {
	for _, l := range t.Layers(sense, units.Stress{}) {
		if l.Depth.Compare(units.Length{}) < 0 || t.Brief.Section.Depth.Less(l.Depth) {
			return false
		}
	}
	return true
}

// judgedStrength reports whether anything was judged at all: a result in
// which nothing was is never satisfied.
func judgedStrength(checks []Check) bool { return Governing(checks) != nil }

// settle holds the assumptions that need no code against the finished trial.
func (p *prepared) settle(t *Trial, register *Register) {
	for sense, assumed := range p.assumedDepth {
		if assumed.IsZero() {
			continue
		}
		d := t.EffectiveDepth(Sense(sense))
		found := "d = " + p.System.Format(d.Amount()) + " of the bars as laid"
		same := d.AtMost(assumed) && assumed.AtMost(d)
		if !same {
			found += "; every check goes by it"
		}
		register.Settle("effective-depth."+Sense(sense).String(), found, same)
	}
	if p.SelfWeight.IsZero() {
		return
	}
	found, same := p.describeWeight(), p.SelfWeight == p.assumedWeight
	if !same {
		found += "; the beam was analysed again with it"
	}
	register.Settle("self-weight.section", found, same)
}

// positions lists every longitudinal bar of the top and bottom by
// coordinates from the left and bottom faces, and the side bars.
func (t *Trial) positions(l *Layout) []BarAt {
	mark := func(face Face, layer int, size *bars.Size) string {
		for i := range l.Longitudinal {
			r := &l.Longitudinal[i]
			if r.Face == face && !r.Flange && (r.Layer == layer || face == Side) && r.Bar == size.Single().Name && max(1, r.Bundled) == size.Bundled() {
				return r.Mark
			}
		}
		return ""
	}
	var out []BarAt
	depth, width := t.Brief.Section.Depth, t.Brief.Section.Width
	web := t.Geometry.WebLeft
	for _, face := range [2]Face{Bottom, Top} {
		var singles []bars.Placed
		for i := range t.Steel(face).Fit.Bars {
			unit := &t.Steel(face).Fit.Bars[i]
			singles = unit.AppendSingles(singles[:0])
			of := mark(face, unit.Layer, &unit.Size)
			for _, b := range singles {
				y := b.Y
				if face == Top {
					y = depth.Sub(b.Y)
				}
				out = append(out, BarAt{Mark: of, Bar: b.Size.Name, Diameter: b.Size.Diameter, X: b.X.Add(web), Y: y, Face: face, Layer: b.Layer})
			}
		}
		out = t.appendFlangeBars(out, l, face)
	}
	if s := &t.Side; s.Each > 0 {
		x := t.Cover.Add(t.Stirrup.Diameter).Add(s.Size.Diameter.Scale(0.5))
		for i := 1; i <= s.Each; i++ {
			y := t.Bottom.Farthest.Add(s.Spacing.Scale(float64(i)))
			if s.TensionFace == Top {
				y = depth.Sub(t.Top.Farthest.Add(s.Spacing.Scale(float64(i))))
			}
			for _, at := range [2]units.Length{x, width.Sub(x)} {
				out = append(out, BarAt{Mark: mark(Side, 0, &s.Size), Bar: s.Size.Name, Diameter: s.Size.Diameter, X: at.Add(web), Y: y, Face: Side})
			}
		}
	}
	return out
}

// appendFlangeBars lists the bars in the flange at a face.
func (t *Trial) appendFlangeBars(out []BarAt, l *Layout, face Face) []BarAt {
	f := t.Steel(face)
	var marks []string // of the flange rows, in order
	for i := range l.Longitudinal {
		if r := &l.Longitudinal[i]; r.Face == face && r.Flange {
			marks = append(marks, r.Mark)
		}
	}
	for i := range f.Flange {
		b := &f.Flange[i]
		y := b.Y
		if face == Top {
			y = t.Brief.Section.Depth.Sub(b.Y)
		}
		out = append(out, BarAt{Mark: marks[b.Row], Bar: b.Size.Name, Diameter: b.Size.Diameter, X: b.X.Add(t.Geometry.WebLeft), Y: y, Face: face, Layer: 1})
	}
	return out
}

// cautions are what a reader must know before using the result.
func (p *prepared) cautions(r *Result) []string {
	c := slices.Clone(p.Code.Cautions())
	if p.refusals != nil {
		return c
	}
	for i := range r.Checks {
		if k := &r.Checks[i]; k.Outcome == NotJudged {
			if said := fmt.Sprintf("Not judged: %s (%s): %s", k.ID, k.Clause, k.Reason); !slices.Contains(c, said) {
				c = append(c, said)
			}
		}
	}
	for _, a := range r.Assumptions {
		switch {
		case a.Open:
			said := "Assumed, for the engineer to confirm: " + a.Assumed
			if a.Found != "" {
				said += "; found: " + a.Found
			}
			c = append(c, said)
		case !a.Holds && a.Decisive:
			c = append(c, "Assumed and refuted: "+a.Assumed+"; found: "+a.Found)
		}
	}
	return c
}
