package aci318

import (
	"fmt"
	"math"

	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// Strengths gives the strengths of a bare section: flexure by 22.2 and 22.3,
// one-way shear by 22.5, torsion by 22.7. With a demand
// it judges them too. The error is a *[beam.InputError] for values that make
// no sense, or says that the section has no strength in bending; what the
// method does not cover is a refusal in the result.
func (c Code) Strengths(q beam.SectionQuery) (beam.Strengths, error) {
	e := c.e
	var out beam.Strengths
	if q.Bending == 0 {
		q.Bending = beam.Positive
		out.Notes = append(out.Notes, "the sense of bending is not stated: taken as positive, tension at the bottom")
	}
	if q.Concrete.Kind == 0 {
		q.Concrete.Kind = beam.Normalweight
		out.Notes = append(out.Notes, "the kind of concrete is not stated: taken as normalweight, λ = 1")
	}
	if q.Section.Shape == 0 {
		q.Section.Shape = beam.Rectangular
	}
	geometry, faults := e.queryFaults(&q)
	if len(faults) > 0 {
		return beam.Strengths{}, &beam.InputError{Faults: faults}
	}
	if out.Refusals = e.queryRefusals(&q); len(out.Refusals) > 0 {
		return out, nil
	}
	section := e.querySection(&q, &geometry)
	var err error
	var strain float64
	out.Flexure, strain, err = e.flexureUnder(section, q.Concrete.Strength, q.Bending, &q.Readings, q.Demand.Axial)
	if err != nil {
		if noEquilibrium(err) {
			return beam.Strengths{}, &beam.InputError{Faults: []beam.Fault{{
				Path: "/layers", Detail: "no layer pulls in " + q.Bending.String() + " bending: " + err.Error(), Allowed: "at least one layer on the tension side",
			}}}
		}
		return beam.Strengths{}, err
	}
	if out.Flexure.Equilibria > 1 {
		out.Notes = append(out.Notes, "with the displaced concrete deducted more than one depth of the neutral axis balances; the least was taken")
	}
	if out.Flexure.Design.IsZero() {
		out.Notes = append(out.Notes, "nothing balances the section under the axial tension: it has no strength in bending, and the rest is that of the section without the force")
	}
	if !oneYield(section) {
		out.Notes = append(out.Notes, noteGrades)
	}
	out.Flexure.MinimumSteel = e.queryLeast(&q, &geometry, &out)
	e.noteFlange(&q, &geometry, &out)
	web := e.queryWeb(&q, &out.Flexure)
	shear := web.at(e, e.queryForces(&q, &web))
	out.Shear = e.shearStrength(&q, &web, &shear)
	torsion, faults := e.queryTorsion(&q, &geometry, &web, &shear, &out.Flexure)
	if len(faults) > 0 {
		return beam.Strengths{}, &beam.InputError{Faults: faults}
	}
	out.Torsion = torsion.answer()
	out.Checks = append(out.Checks, e.queryChecks(&q, &geometry, &out, strain, &web, &shear, &torsion)...)
	return out, nil
}

// queryLeast is As,min of a query (9.6.1.2). Nothing says whether the beam is
// statically determinate, so that the stricter is taken.
func (e *edition) queryLeast(q *beam.SectionQuery, g *beam.Geometry, out *beam.Strengths) units.Area {
	w := e.minimumWidth(q.Section.Width, g.FaceWidth(q.Bending.TensionFace()), true)
	if w.flanged {
		out.Notes = append(out.Notes, "least steel goes by the lesser of bf and 2bw, as of a statically determinate beam with its flange in tension; in an indeterminate beam it goes by bw (9.6.1.2)")
	}
	m := e.minimumSteel(q.Concrete.Strength, leastYield(q), w, out.Flexure.EffectiveDepth)
	return e.areaOf(m.area)
}

// leastYield is the least yield strength of the layers.
func leastYield(q *beam.SectionQuery) units.Stress {
	least := q.Layers[0].Yield
	for i := range q.Layers {
		least = least.Min(q.Layers[i].Yield)
	}
	return least
}

// noteFlange says what a flange takes for granted, and judges an isolated tee.
func (e *edition) noteFlange(q *beam.SectionQuery, g *beam.Geometry, out *beam.Strengths) {
	s := &q.Section
	switch {
	case s.Isolated:
		c := isolatedCheck(s)
		c.Combination = q.Demand.Name
		if out.Checks = append(out.Checks, c); c.Outcome == beam.Fail {
			out.Notes = append(out.Notes, "the flange does not meet 6.3.2.2, by which an isolated tee may count it")
		}
	case s.Shape == beam.Polygon && !g.Overall.AtMost(s.Width):
		out.Notes = append(out.Notes, "the whole outline is taken to work together: 6.3.2 limits what of a slab does, which is to be given as tee or ell")
	case s.Flange() == beam.Top:
		out.Notes = append(out.Notes, "the flange width is taken as given: 6.3.2.1 limits what works with the web")
	}
	if s.Flange() != 0 && s.Flange() == q.Bending.TensionFace() && g.Overall != s.Width {
		out.Notes = append(out.Notes, "the flange is in tension: 24.3.4 spreads a part of the steel over it")
	}
}

// queryFaults names every value of a query that makes no sense, and measures the
// section.
func (e *edition) queryFaults(q *beam.SectionQuery) (beam.Geometry, []beam.Fault) {
	f := queryFaults{e: e}
	geometry, faults := beam.MeasureSection(e.system, &q.Section)
	f.list = faults
	sound := len(faults) == 0
	f.within("/concrete/strength", "concrete strength", q.Concrete.Strength.Amount(), leastStress.Amount(), mostConcrete.Amount())
	if fault, wrong := e.densityFault(&q.Concrete); wrong {
		f.list = append(f.list, fault)
	}
	if q.Bending > beam.Negative {
		f.add("/bending", "sense of bending is not known", "positive, negative")
	}
	if n := len(q.Layers); n == 0 || n > mostLayers {
		f.add("/layers", fmt.Sprintf("%d layers given", n), fmt.Sprintf("1 to %d", mostLayers))
	}
	for i, l := range q.Layers {
		path := fmt.Sprintf("/layers/%d", i)
		f.within(path+"/area", "area", l.Area.Amount(), leastBars.Amount(), mostBars.Amount())
		if sound {
			f.within(path+"/depth", "depth", l.Depth.Amount(), units.Length{}.Amount(), q.Section.Depth.Amount())
		}
		f.within(path+"/yield", "yield strength", l.Yield.Amount(), leastStress.Amount(), mostSteel.Amount())
	}
	if s := q.Stirrups; s != nil {
		f.within("/stirrups/area", "area", s.Area.Amount(), leastBars.Amount(), mostBars.Amount())
		f.within("/stirrups/spacing", "spacing", s.Spacing.Amount(), leastLength.Amount(), mostSide.Amount())
		f.within("/stirrups/yield", "yield strength", s.Yield.Amount(), leastStress.Amount(), mostSteel.Amount())
		f.within("/stirrups/cover", "cover", s.Cover.Amount(), units.Length{}.Amount(), mostSide.Amount())
		f.within("/stirrups/diameter", "diameter", s.Diameter.Amount(), units.Length{}.Amount(), mostSide.Amount())
		f.within("/stirrups/across", "distance between legs", s.Across.Amount(), units.Length{}.Amount(), mostSide.Amount())
	}
	f.faultShear(q)
	d := &q.Demand
	f.within("/demand/moment", "moment", d.Moment.Amount(), mostMoment.Neg().Amount(), mostMoment.Amount())
	f.within("/demand/shear", "shear", d.Shear.Amount(), mostForce.Neg().Amount(), mostForce.Amount())
	f.within("/demand/torque", "torque", d.Torque.Amount(), mostMoment.Neg().Amount(), mostMoment.Amount())
	f.within("/demand/axial", "axial force", d.Axial.Amount(), mostForce.Neg().Amount(), mostForce.Amount())
	if m := d.Moment.Compare(units.Moment{}); m > 0 && q.Bending == beam.Negative || m < 0 && q.Bending == beam.Positive {
		f.add("/demand/moment", "moment "+e.system.Format(d.Moment.Amount())+" does not bend the section in the sense asked for, "+q.Bending.String(),
			"sagging moments are positive, hogging moments negative")
	}
	return geometry, f.list
}

// Bounds of a query. They belong to no design code: they are wide enough for
// any beam that is built and narrow enough that a slipped unit is caught.
var (
	mostSide     = units.Metre.Of(10)
	leastLength  = units.Millimetre.Of(1)
	leastStress  = units.Megapascal.Of(1)
	mostConcrete = units.Megapascal.Of(250)
	mostSteel    = units.Megapascal.Of(1500)
	leastBars    = units.SquareMillimetre.Of(1)
	mostBars     = units.SquareMetre.Of(1)
	mostForce    = units.Kilonewton.Of(1e6)
	mostMoment   = units.KilonewtonMetre.Of(1e7)
)

const mostLayers = 100

type queryFaults struct {
	e    *edition
	list []beam.Fault
}

func (f *queryFaults) add(path, detail, allowed string) {
	f.list = append(f.list, beam.Fault{Path: path, Detail: detail, Allowed: allowed})
}

func (f *queryFaults) within(path, what string, v, least, most units.Amount) bool {
	if v.IsFinite() && least.AtMost(v) && v.AtMost(most) {
		return true
	}
	said := "not a finite number"
	if v.IsFinite() {
		said = f.e.system.Format(v)
	}
	f.add(path, what+" is "+said, f.e.system.Format(least)+" to "+f.e.system.Format(most))
	return false
}

// queryRefusals names what puts a section outside the method.
func (e *edition) queryRefusals(q *beam.SectionQuery) []beam.Refusal {
	out := e.materialRefusals(&q.Concrete, q.Layers[0].Yield)
	for i := range q.Layers[1:] {
		if fy := q.Layers[i+1].Yield; fy != q.Layers[i].Yield {
			out = append(out, e.steelRefusals(fy)...)
		}
	}
	out = append(out, e.axialRefusals(queryGross(q), &q.Concrete, q.Demand.Axial, q.Demand.Name)...)
	return out
}

// querySection is the section of a query, for the kernel.
func (e *edition) querySection(q *beam.SectionQuery, g *beam.Geometry) mechanics.Section {
	s := mechanics.Section{Parts: g.Parts, Layers: make([]mechanics.Layer, len(q.Layers))}
	for i, l := range q.Layers {
		s.Layers[i] = mechanics.Layer{Depth: l.Depth, Area: l.Area, Steel: e.barSteel(l.Yield)}
	}
	return s
}

// queryChecks judges a demand; none where nothing is asked.
func (e *edition) queryChecks(q *beam.SectionQuery, g *beam.Geometry, out *beam.Strengths, strain float64, web *webSteel, s *sectionShear, t *queryTorsion) []beam.Check {
	d := &q.Demand
	if *d == (beam.Demand{Name: d.Name}) {
		return nil
	}
	var checks []beam.Check
	compare := func(id, clause, reason string, demand, capacity units.Amount) {
		c := beam.Check{ID: id, Clause: clause, Reason: reason, Combination: d.Name}
		c.Compare(demand, capacity)
		checks = append(checks, c)
	}
	if !d.Moment.IsZero() || out.Flexure.Design.IsZero() {
		id, f := bendingIDs[q.Bending], &out.Flexure
		compare(id.strength, "9.5.1.1", "", d.Moment.Abs().Amount(), f.Design.Amount())
		if c := &checks[len(checks)-1]; f.Design.IsZero() {
			c.Outcome, c.Utilization, c.Reason = beam.Fail, beam.NoCapacity, "nothing balances the section under the axial force"
		}
		compare(id.strain, "9.3.3.1", "", units.Plain(f.LeastStrain), units.Plain(strain))
		clause, need, reason := e.queryMinimum(q, g, f)
		compare(id.minimum, clause, reason, need.Amount(), f.TensionSteel.Amount())
	}
	checks = append(checks, e.queryTension(q, g)...)
	if !d.Shear.IsZero() {
		checks = append(checks, e.queryShear(q, &out.Shear, web, s)...)
	}
	return append(checks, t.checks()...)
}

// queryTension judges an axial tension that pulls on the steel of both halves of
// the depth, as judgeTension does; a layer at half the depth is of the lower.
func (e *edition) queryTension(q *beam.SectionQuery, g *beam.Geometry) []beam.Check {
	depth := e.lengthIn(q.Section.Depth)
	var areas, firsts [2]float64
	var yields [2]units.Stress
	for _, l := range q.Layers {
		i, at, area := 0, e.lengthIn(l.Depth), e.areaIn(l.Area)
		if at < depth/2 {
			i = 1
		}
		if areas[i] == 0 || l.Yield.Less(yields[i]) {
			yields[i] = l.Yield
		}
		areas[i] += area
		firsts[i] += area * at
	}
	at := [2]float64{depth, 0} // without steel, the faces
	for i := range at {
		if areas[i] > 0 {
			at[i] = firsts[i] / areas[i]
		}
	}
	p := e.facePulls(g.Parts, q.Demand.Axial, q.Demand.Moment, e.lengthOf(at[0]), e.lengthOf(at[1]))
	if !p.pulled {
		return nil
	}
	var checks []beam.Check
	for i := range at {
		checks = append(checks, e.pullCheck(&p, i, e.areaOf(areas[i]), yields[i], q.Demand.Name))
	}
	return checks
}

// queryMinimum is the least steel of 9.6.1 at the demand.
func (e *edition) queryMinimum(q *beam.SectionQuery, g *beam.Geometry, f *beam.FlexureStrength) (clause string, need units.Area, reason string) {
	if f.MinimumSteel.AtMost(f.TensionSteel) {
		return "9.6.1.2", f.MinimumSteel, ""
	}
	z := e.sizing(g.Parts, q.Bending, q.Concrete.Strength, leastYield(q), f.EffectiveDepth, f.ExtremeDepth, q.Readings.RoundedYield)
	z.yieldStrain = f.YieldStrain
	req := z.tension(math.Abs(e.momentIn(q.Demand.Moment)))
	pulled := q.Demand.Axial.Compare(units.Force{}) < 0 // as in judgeMinimum
	if waived := e.areaOf(e.minimum.waiver * req.area); req.ok && !pulled && waived.Less(f.MinimumSteel) {
		return "9.6.1.3", waived, waiverReason
	}
	return "9.6.1.2", f.MinimumSteel, ""
}
