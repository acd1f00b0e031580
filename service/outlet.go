package service

import (
	"encoding/json"
	"slices"

	"soffit.example/beam"
	"soffit.example/beam/working"
	"soffit.example/service/internal/wire"
	"soffit.example/units"
)

// outlet turns results into replies in one system of units. Lists that are
// empty are written as such: a reader need not ask whether they are there.
type outlet struct {
	system units.System
	full   bool // with the working of each check
}

// express is a quantity in the units of the reply.
func express[Q interface{ Amount() units.Amount }](o *outlet, q Q) units.Measure {
	return o.system.Express(q.Amount())
}

// optional is a quantity that zero means the absence of.
func optional[Q interface{ Amount() units.Amount }](o *outlet, q Q) *units.Measure {
	if q.Amount().IsZero() {
		return nil
	}
	m := express(o, q)
	return &m
}

// place is a position along a span, in feet or metres.
func (o *outlet) place(q units.Length) *units.Measure {
	unit := units.Metre
	if o.system == units.US {
		unit = units.Foot
	}
	m := unit.Express(q)
	return &m
}

// surface is an area of formwork, in square feet or metres.
func (o *outlet) surface(q units.Area) units.Measure {
	if o.system == units.US {
		return units.SquareFoot.Express(q)
	}
	return units.SquareMetre.Express(q)
}

// mostRejected is how many rejected arrangements a reply has room for: a beam
// that is too small can have tens of thousands.
const mostRejected = 500

func (o *outlet) design(r *beam.Result, inputHash string) wire.Design {
	d := wire.Design{
		Engine: engine(r.Engine), Code: r.Code, Reference: r.Reference, ReportIn: o.system, InputHash: inputHash,
		Verdict:      r.Verdict.String(),
		Layout:       o.layout(&r.Layout),
		Checks:       o.checks(r.Checks),
		Refusals:     refusals(r.Refusals),
		Assumptions:  assumptions(r.Assumptions),
		Combinations: combinations(r.Kept, r.Dropped),
		Binding:      orEmpty(r.Binding),
		Cautions:     orEmpty(r.Cautions),
	}
	if g := r.Governing; g != nil {
		d.Governing = &wire.Governing{Check: g.ID, Utilization: g.Utilization}
	}
	if r.Section.Shape != 0 {
		var measured beam.Geometry
		if r.Problem != nil {
			measured = r.Problem.Geometry
		}
		d.Section = o.section(&r.Section, &measured)
	}
	d.Bars = make([]wire.BarAt, len(r.Bars))
	for i, b := range r.Bars {
		d.Bars[i] = wire.BarAt{Mark: b.Mark, Bar: b.Bar, Diameter: express(o, b.Diameter), X: express(o, b.X), Y: express(o, b.Y), Face: b.Face.String(), Layer: b.Layer}
	}
	d.Reactions = make([]wire.Reaction, len(r.Reactions))
	for i, s := range r.Reactions {
		d.Reactions[i] = wire.Reaction{
			Support: s.Support, Most: express(o, s.Most), Least: express(o, s.Least),
			CombinationMost: s.MostBy, CombinationLeast: s.LeastBy, Moment: optional(o, s.Moment),
			Torque: optional(o, s.Torque), CombinationTorque: s.TorqueBy,
		}
	}
	d.NotJudged = []string{}
	for i := range r.Checks {
		if c := &r.Checks[i]; c.Outcome == beam.NotJudged && !slices.Contains(d.NotJudged, c.ID) {
			d.NotJudged = append(d.NotJudged, c.ID)
		}
	}
	d.Flexure = make([]wire.Flexure, len(r.Flexure))
	for i := range r.Flexure {
		d.Flexure[i] = o.flexure(&r.Flexure[i])
	}
	d.Alternatives = make([]wire.Alternative, len(r.Alternatives))
	for i := range r.Alternatives {
		a := &r.Alternatives[i]
		d.Alternatives[i] = wire.Alternative{
			Layout: o.layout(&a.Layout), Depth: express(o, a.Depth), SteelMass: express(o, a.SteelMass),
			Governing:   wire.Governing{Check: a.Governing, Utilization: a.Utilization},
			WhyNotFirst: a.WhyNotFirst,
		}
	}
	d.Rejected = make([]wire.Rejected, min(len(r.Rejected), mostRejected))
	d.RejectedMore = len(r.Rejected) - len(d.Rejected)
	for i := range d.Rejected {
		d.Rejected[i] = wire.Rejected{Arrangement: r.Rejected[i].Arrangement.Describe(o.system), Failed: o.describe(r.Rejected[i].Failed)}
	}
	d.Cures = make([]wire.Cure, len(r.Cures))
	for i, c := range r.Cures {
		d.Cures[i] = wire.Cure{Change: c.Change, From: o.system.Express(c.From), To: o.system.Express(c.To), Governing: c.Governing, Utilization: c.Utilization}
	}
	d.Schedule = make([]wire.ScheduleLine, len(r.Schedule))
	for i, l := range r.Schedule {
		d.Schedule[i] = wire.ScheduleLine{
			Mark: l.Mark, Bar: l.Bar, Count: l.Count, Shape: l.Shape, Length: optional(o, l.Length),
			Mass: units.Measure{Number: json.Number(l.Mass.String()), Unit: l.MassUnit},
		}
	}
	if r.Verdict != beam.OutOfScope {
		d.Quantities = o.quantities(&r.Quantities)
	}
	return d
}

func engine(e beam.Engine) wire.Engine { return wire.Engine{Name: e.Name, Version: e.Version} }

// orEmpty is a list that is never null.
func orEmpty(list []string) []string {
	if list == nil {
		return []string{}
	}
	return list
}

func (o *outlet) checks(list []beam.Check) []wire.Check {
	out := make([]wire.Check, len(list))
	for i := range list {
		c := &list[i]
		w := wire.Check{
			ID: c.ID, Clause: c.Clause, Span: c.Span, Face: c.Face.String(), Combination: c.Combination,
			Verdict: c.Outcome.String(), Reason: c.Reason,
		}
		if c.HasAt {
			w.At = o.place(c.At)
		}
		judged := c.Outcome == beam.Pass || c.Outcome == beam.Fail
		if known := c.Capacity != (units.Amount{}); judged || known && c.Outcome == beam.NotJudged {
			demand, capacity := o.system.Express(c.Demand), o.system.Express(c.Capacity)
			w.Demand, w.Capacity, w.Utilization = &demand, &capacity, &c.Utilization
		}
		if o.full {
			for _, l := range working.Lines(c, o.system) {
				w.Working = append(w.Working, wire.Step(l))
			}
		}
		out[i] = w
	}
	return out
}

// describe says checks in a line each.
func (o *outlet) describe(list []beam.Check) []string {
	out := make([]string, len(list))
	for i := range list {
		out[i] = list[i].Describe(o.system)
	}
	return out
}

func refusals(list []beam.Refusal) []wire.Refusal {
	out := make([]wire.Refusal, len(list))
	for i, r := range list {
		out[i] = wire.Refusal(r)
	}
	return out
}

func assumptions(list []beam.Assumption) []wire.Assumption {
	out := make([]wire.Assumption, len(list))
	for i, a := range list {
		status := "refuted"
		switch {
		case a.Open:
			status = "to-confirm"
		case a.Holds:
			status = "confirmed"
		}
		out[i] = wire.Assumption{Status: status, ID: a.ID, Assumed: a.Assumed, UsedIn: orEmpty(a.UsedIn), Found: a.Found, Holds: a.Holds, Open: a.Open, Decisive: a.Decisive}
	}
	return out
}

func combinations(kept []beam.Combination, dropped []beam.DroppedCombination) wire.Combinations {
	w := wire.Combinations{Kept: make([]wire.Combination, len(kept)), Dropped: make([]wire.DroppedCombination, len(dropped))}
	for i, c := range kept {
		w.Kept[i] = wire.Combination{ID: c.ID, Clause: c.Clause, Factors: make([]wire.Factor, len(c.Factors))}
		for j, f := range c.Factors {
			w.Kept[i].Factors[j] = wire.Factor{Case: f.Case.String(), Factor: f.Factor}
		}
	}
	for i, c := range dropped {
		w.Dropped[i] = wire.DroppedCombination(c)
	}
	return w
}

func (o *outlet) quantities(q *beam.Quantities) *wire.Quantities {
	w := &wire.Quantities{
		SteelMass: express(o, q.SteelMass), StirrupMass: express(o, q.StirrupMass), Concrete: express(o, q.Concrete),
		Form: o.surface(q.Form), SteelPerConcrete: express(o, q.SteelPerConcrete),
	}
	if q.PerLength {
		w.PerLength = o.place(units.Metre.Of(1))
	}
	return w
}

// printedDigits is the relative size of the last digit that replies have; a
// difference below it is noise, not the same on every machine.
const printedDigits = 1e-12

func (o *outlet) flexure(f *beam.FlexureStrength) wire.Flexure {
	w := wire.Flexure{
		Sense: f.Sense.String(), NeutralAxis: express(o, f.NeutralAxis), BlockDepth: express(o, f.BlockDepth), Beta1: f.BlockFactor,
		EffectiveDepth: express(o, f.EffectiveDepth), ExtremeDepth: express(o, f.ExtremeDepth), ExtremeStrain: f.ExtremeStrain,
		YieldStrain: f.YieldStrain, LeastStrain: f.LeastStrain, Class: f.Class, Phi: f.Phi,
		Nominal: express(o, f.Nominal), Design: express(o, f.Design),
		TensionSteel: express(o, f.TensionSteel), MinimumSteel: express(o, f.MinimumSteel),
		Layers: make([]wire.LayerState, len(f.Layers)), Equilibria: f.Equilibria,
	}
	for i, l := range f.Layers {
		w.Layers[i] = wire.LayerState{Strain: l.Strain, Stress: express(o, l.Stress), Force: express(o, l.Force)}
	}
	if c := f.CrossCheck; c.Method != "" {
		w.CrossCheck = &wire.CrossCheck{Method: c.Method, Nominal: express(o, c.Nominal)}
		if c.Difference > printedDigits {
			w.CrossCheck.Difference = c.Difference
		}
	}
	return w
}
