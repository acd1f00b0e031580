package service

import (
	"context"
	"errors"
	"fmt"
	"net/http"
	"strings"

	"soffit.example/beam"
	"soffit.example/service/internal/strict"
	"soffit.example/service/internal/wire"
)

// strengths answers POST /v1/strengths.
func (s *Service) strengths(w http.ResponseWriter, r *http.Request) error {
	faults := &strict.Faults{Most: s.limits.Faults}
	request, err := read(s, w, r, s.sections, faults)
	if err != nil {
		return err
	}
	code := s.code(request.Code, faults, "/code")
	in := intakeFor(code, faults)
	query := in.query(&request)
	if !faults.None() {
		// The code adds what it sees; it computes next to nothing.
		if code != nil {
			if _, err := code.Strengths(query); err != nil {
				addInput(faults, err, "")
			}
		}
		return invalidInput(faults.All())
	}
	var found beam.Strengths
	err = s.compute(r.Context(), func(context.Context) (err error) {
		found, err = code.Strengths(query)
		return err
	})
	switch {
	case errors.Is(err, beam.ErrNotOffered):
		return invalidInput([]strict.Fault{{Path: "/code", Detail: fmt.Sprintf("code is %q, which gives no strengths of a bare section", request.Code)}})
	case err != nil:
		return err
	}
	sum, err := hash(request)
	if err != nil {
		return err
	}
	out := outlet{system: reportIn(request.ReportIn, code.Edition().System)}
	answer := out.strengths(&found)
	if answer.Flexure != nil {
		section := query.Section
		measured, _ := beam.GeometryOf(&section) // a section with faults has no strengths
		answer.Section = out.section(&section, &measured)
	}
	answer.Engine, answer.Code, answer.ReportIn, answer.InputHash = thisEngine(), request.Code, out.system, sum
	answer.Cautions = orEmpty(code.Cautions())
	return reply(w, http.StatusOK, answer)
}

func thisEngine() wire.Engine { return wire.Engine{Name: "soffit", Version: beam.Version} }

func (in *intake) query(w *wire.StrengthsRequest) beam.SectionQuery {
	q := beam.SectionQuery{
		Section:  in.section(&w.Section, "/section"),
		Concrete: in.concrete(&w.Concrete, "/concrete"),
		Bending:  beam.Positive,
		Readings: readings(w.DisplacedConcrete, w.Grade60Yield, w.ShearRow, w.ShearMethod, nil),
	}
	q.Readings.TorsionAngle = value(w.TorsionAngle)
	if w.Section.Slab != nil {
		in.fault("/section/slab", "a flange_width", "does not belong to a bare section: the width that works with the web follows from the clear span too")
	}
	if w.Bending != nil {
		q.Bending = word[beam.Sense](w.Bending)
	}
	for i := range w.Layers {
		l := &w.Layers[i]
		q.Layers = append(q.Layers, beam.SteelLayer{
			Area:  above(in, fmt.Sprintf("/layers/%d/area", i), &l.Area),
			Depth: above(in, fmt.Sprintf("/layers/%d/depth", i), &l.Depth),
			Yield: above(in, fmt.Sprintf("/layers/%d/yield", i), &l.Yield),
		})
	}
	if v := w.Stirrups; v != nil {
		q.Stirrups = &beam.StirrupSteel{
			Area:     above(in, "/stirrups/area", &v.Area),
			Spacing:  above(in, "/stirrups/spacing", &v.Spacing),
			Yield:    above(in, "/stirrups/yield", &v.Yield),
			Cover:    above(in, "/stirrups/cover", v.Cover),
			Diameter: above(in, "/stirrups/diameter", v.Diameter),
			Across:   above(in, "/stirrups/across", v.Across),
			Legs:     value(v.Legs),
			Angle:    value(v.Angle),
			Open:     value(v.Form) == "open",
		}
	}
	if v := w.Bent; v != nil {
		q.Bent = &beam.BentSteel{
			Area:    above(in, "/bent/area", &v.Area),
			Yield:   above(in, "/bent/yield", &v.Yield),
			Angle:   v.Angle,
			Spacing: above(in, "/bent/spacing", v.Spacing),
		}
	}
	if w.Demand != nil {
		q.Demand = in.demand(w.Demand, 0, "/demand")
	}
	return q
}

func (o *outlet) strengths(s *beam.Strengths) wire.Strengths {
	w := wire.Strengths{
		Verdict:  "not-applicable",
		Checks:   o.checks(s.Checks),
		Refusals: refusals(s.Refusals),
		Notes:    orEmpty(s.Notes),
	}
	if len(s.Refusals) > 0 {
		w.Verdict = beam.OutOfScope.String()
		return w
	}
	switch {
	case beam.Failing(s.Checks):
		w.Verdict = beam.Unsatisfied.String()
	case beam.Governing(s.Checks) != nil:
		w.Verdict = beam.Satisfied.String()
	}
	flexure := o.flexure(&s.Flexure)
	flexure.Verdict = verdictOf(s.Checks, "flexure")
	w.Flexure = &flexure
	v := &s.Shear
	w.Shear = &wire.Shear{
		Concrete: express(o, v.Concrete), ConcreteRow: v.ConcreteRow, SizeEffect: v.SizeEffect, SteelRatio: v.SteelRatio,
		Steel: express(o, v.Steel), Nominal: express(o, v.Nominal), Phi: v.Phi, Design: express(o, v.Design),
		SectionLimit: express(o, v.SectionLimit), MinimumPerLength: optional(o, v.MinimumPerLength), MinimumRequired: v.MinimumRequired,
		GreatestSpacing: express(o, v.GreatestSpacing), GreatestAcross: optional(o, v.GreatestAcross),
		Notes: orEmpty(v.Notes), Verdict: verdictOf(s.Checks, "shear"),
	}
	w.Torsion = o.torsion(&s.Torsion)
	w.Torsion.Verdict = verdictOf(s.Checks, "torsion")
	return w
}

func (o *outlet) torsion(t *beam.TorsionStrength) *wire.Torsion {
	return &wire.Torsion{
		Area: express(o, t.Area), Perimeter: express(o, t.Perimeter), FlangeCounted: t.FlangeCounted, Hollow: t.Hollow,
		Threshold: express(o, t.Threshold), Cracking: express(o, t.Cracking), Phi: t.Phi, MayBeNeglected: t.MayBeNeglected,
		Torque: optional(o, t.Torque), Shed: optional(o, t.Shed),
		StirrupArea: optional(o, t.StirrupArea), StirrupPerimeter: optional(o, t.StirrupPerimeter), FlowArea: optional(o, t.FlowArea), Angle: t.Angle,
		Stress: optional(o, t.Section), StressLimit: optional(o, t.SectionLimit),
		Transverse: optional(o, t.Transverse), OuterLeg: optional(o, t.OuterLeg), OuterLegProvided: optional(o, t.OuterLegProvided),
		MinimumPerLength: optional(o, t.MinimumTransverse), GreatestSpacing: optional(o, t.GreatestSpacing),
		Longitudinal: optional(o, t.Longitudinal), MinimumLongitudinal: optional(o, t.MinimumLongitudinal),
		Nominal: optional(o, t.Nominal), Design: optional(o, t.Design), Notes: orEmpty(t.Notes),
	}
}

// verdictOf is the verdict of the checks whose id begins with a word: failed
// if one fails, passed if one at least was judged.
func verdictOf(checks []beam.Check, first string) string {
	verdict := beam.NotApplicable
	for i := range checks {
		if head, _, _ := strings.Cut(checks[i].ID, "."); head != first {
			continue
		}
		switch checks[i].Outcome {
		case beam.Fail:
			return beam.Fail.String()
		case beam.Pass:
			verdict = beam.Pass
		case beam.NotJudged:
			if verdict == beam.NotApplicable {
				verdict = beam.NotJudged
			}
		}
	}
	return verdict.String()
}
