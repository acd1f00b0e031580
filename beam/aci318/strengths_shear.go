package aci318

import (
	"fmt"

	"soffit.example/beam"
	"soffit.example/units"
)

// faultShear names values of the steel across the web that make no sense.
func (f *queryFaults) faultShear(q *beam.SectionQuery) {
	if s := q.Stirrups; s != nil {
		if s.Legs < 0 || s.Legs == 1 || s.Legs > mostLegs {
			f.add("/stirrups/legs", fmt.Sprintf("legs is %d", s.Legs), fmt.Sprintf("2 to %d", mostLegs))
		}
		if s.Angle != 0 {
			f.angle("/stirrups/angle", s.Angle)
		}
	}
	if b := q.Bent; b != nil {
		f.within("/bent/area", "area", b.Area.Amount(), leastBars.Amount(), mostBars.Amount())
		f.within("/bent/yield", "yield strength", b.Yield.Amount(), leastStress.Amount(), mostSteel.Amount())
		f.angle("/bent/angle", b.Angle)
		if !b.Spacing.IsZero() {
			f.within("/bent/spacing", "spacing", b.Spacing.Amount(), leastLength.Amount(), mostSide.Amount())
		}
	}
}

func (f *queryFaults) angle(path string, degrees float64) {
	if !(degrees >= flattest && degrees <= 90) {
		f.add(path, fmt.Sprintf("angle with the axis of the beam is %g degrees", degrees), fmt.Sprintf("%g to 90 degrees", flattest))
	}
}

// Bounds of a query, as of a layout.
const (
	mostLegs = 20
	flattest = 15.0
)

// queryWeb prepares the section for shear: ρw counts the layers in flexural
// tension, and d is the depth of their centroid.
func (e *edition) queryWeb(q *beam.SectionQuery, f *beam.FlexureStrength) webSteel {
	section := q.Section
	g, _ := beam.GeometryOf(&section)
	s := e.shearSection(&section, &g, &q.Concrete, &q.Readings)
	s.depth, s.area = f.EffectiveDepth, f.TensionSteel
	if t := q.Stirrups; t != nil {
		s.stirrups = stirrupSteel{area: t.Area, spacing: t.Spacing, yield: t.Yield, angle: t.Angle}
	}
	return e.newWebSteel(&s)
}

// queryGross is Ag of a query's section.
func queryGross(q *beam.SectionQuery) units.Area {
	section := q.Section
	g, _ := beam.GeometryOf(&section)
	return g.Gross
}

// queryForces are the forces of a demand, with what the bent bars carry. They
// and leaning stirrups are taken to stand against the shear.
func (e *edition) queryForces(q *beam.SectionQuery, web *webSteel) shearForces {
	f := shearForces{shear: q.Demand.Shear, moment: q.Demand.Moment, axial: q.Demand.Axial}
	if q.Bent != nil {
		g := e.queryBent(q.Bent, web)
		f.bent = g.share(web.bare.d)
	}
	return f
}

// queryBent are the bent bars of a query. How high they slope is not said: the
// effective depth is taken.
func (e *edition) queryBent(b *beam.BentSteel, web *webSteel) bentGroup {
	yield, capped := e.shearYield(b.Yield)
	return bentGroup{
		area: e.areaIn(b.Area), fy: e.stressIn(yield), fyCapped: capped, slope: slopeOf(b.Angle),
		height: web.bare.d, spacing: e.lengthIn(b.Spacing), series: !b.Spacing.IsZero(),
	}
}

func (e *edition) shearStrength(q *beam.SectionQuery, web *webSteel, s *sectionShear) beam.ShearStrength {
	v := beam.ShearStrength{
		Concrete: e.forceOf(s.concrete.strength), ConcreteRow: s.concrete.row.String(),
		SizeEffect: 1, SteelRatio: web.bare.ratio,
		Steel: e.forceOf(web.steel + s.bent), Nominal: e.forceOf(s.nominal), Phi: web.phi, Design: e.forceOf(s.design),
		SectionLimit: e.forceOf(s.limit), MinimumPerLength: e.steelOf(web.least), MinimumRequired: s.required,
		GreatestSpacing: e.lengthOf(s.along), GreatestAcross: e.lengthOf(s.across),
	}
	if s.concrete.row == rowC {
		v.SizeEffect = web.bare.size
	}
	say := func(when bool, note string) {
		if when {
			v.Notes = append(v.Notes, note)
		}
	}
	cap := e.stress.Format(e.stressOf(e.materials.mostShearYield))
	light := &web.bare.light
	say(light.route != "", fmt.Sprintf("λ = %.4g %s (%s)", light.factor, light.route, light.clause))
	say(web.fytCapped, "the stirrups count with "+cap+" of their yield strength ("+e.materials.yieldClause+")")
	say(s.concrete.rootCapped, "√f'c is capped for Vc, as there are not the least stirrups (22.5.3.1)")
	say(s.concrete.axialCapped, "the axial term is capped at 0.05 f'c (22.5.5.1.2)")
	say(s.concrete.row == rowNone, "axial tension leaves no concrete shear strength")
	say(web.av > 0 && web.flat, fmt.Sprintf("stirrups flatter than %g degrees do not count (%s)", leastSlope, e.stirrups.slopeClause))
	say(web.av > 0 && !web.enough, "the stirrups are fewer or wider than least reinforcement, so that Vc is that of a beam without them")
	say(web.bare.joist, "Vc holds the 1.1 of joists (9.8.1.5)")
	say(q.Section.Joist && !web.bare.joist, "the rib breaks a limit of 9.8.1 and is no joist (9.8.1.8)")
	if web.exempt != 0 {
		say(true, web.exempt.note(e)+" (Table 9.6.3.1)")
	}
	if q.Bent != nil {
		g := e.queryBent(q.Bent, web)
		say(s.bent > 0, fmt.Sprintf("bent bars carry %s of Vs where a section cuts the central three quarters of their slope", beam.Short(e.system, e.forceOf(s.bent).Amount())))
		say(s.bent > 0 && !g.series && s.bent < g.single(), fmt.Sprintf("a single group of bent bars carries no more than %g √f'c bw d (%s)", e.stirrups.bentMost, e.stirrups.bentSingleClause))
		say(s.bent == 0, "the bent bars are too flat, or too far apart, to count")
		say(g.fyCapped, "the bent bars count with "+cap+" of their yield strength in shear ("+e.materials.yieldClause+")")
	}
	return v
}

// queryShear judges the shear of a demand.
func (e *edition) queryShear(q *beam.SectionQuery, v *beam.ShearStrength, web *webSteel, s *sectionShear) []beam.Check {
	shear := q.Demand.Shear.Abs().Amount()
	strength := beam.Check{ID: "shear.strength", Clause: "22.5.1.1", Combination: q.Demand.Name}
	strength.Compare(shear, v.Design.Amount())
	limit := beam.Check{ID: "shear.section-limit", Clause: "22.5.1.2", Combination: q.Demand.Name}
	limit.Compare(shear, v.SectionLimit.Amount())
	checks := append([]beam.Check{strength, limit}, e.queryStirrups(q, web, s)...)
	return append(checks, e.querySlopes(q, web, s)...)
}

// querySlopes judges the angle and the spacing of steel that lies across the web
// at a slope.
func (e *edition) querySlopes(q *beam.SectionQuery, web *webSteel, s *sectionShear) (checks []beam.Check) {
	compare := func(id, clause, reason string, demand, capacity units.Amount) {
		c := beam.Check{ID: id, Clause: clause, Reason: reason, Combination: q.Demand.Name}
		c.Compare(demand, capacity)
		checks = append(checks, c)
	}
	if web.av > 0 && !web.slope.upright() {
		compare("shear.stirrup-angle", e.stirrups.slopeClause, noteFlat, units.Plain(leastSlope), units.Plain(web.slope.degrees))
		compare("shear.spacing-inclined", "9.7.6.2.3", noteInclined, q.Stirrups.Spacing.Amount(), e.lengthOf(web.mostInclined(s.heavy)).Amount())
	}
	if q.Bent != nil {
		g := e.queryBent(q.Bent, web)
		compare("shear.bent-angle", e.stirrups.bentSlopeClause, noteFlatBend, units.Plain(leastBend), units.Plain(g.slope.degrees))
		if g.series {
			compare("shear.bent-spacing", "9.7.6.2.3", noteWideBends, q.Bent.Spacing.Amount(), e.lengthOf(g.most(web.bare.d, s.heavy)).Amount())
		}
	}
	return checks
}

// queryStirrups judges least stirrups and their spacings.
func (e *edition) queryStirrups(q *beam.SectionQuery, web *webSteel, s *sectionShear) []beam.Check {
	least := beam.Check{ID: "shear.minimum-stirrups", Clause: "9.6.3.1", Combination: q.Demand.Name}
	if q.Stirrups == nil {
		least.Reason = "no stirrups: the shear may not call for them"
		least.Compare(e.forceOf(s.shear).Amount(), e.forceOf(s.trigger).Amount())
		return []beam.Check{least}
	}
	along := beam.Check{ID: "shear.spacing-along", Clause: "Table 9.7.6.2.2", Combination: q.Demand.Name}
	across := beam.Check{ID: "shear.spacing-across", Clause: "Table 9.7.6.2.2", Combination: q.Demand.Name}
	if !s.required {
		for _, c := range []*beam.Check{&least, &along, &across} {
			c.Outcome, c.Reason = beam.NotApplicable, "the shear does not call for stirrups"
		}
	} else {
		if units.AtMost(s.shear, s.trigger) {
			least.Outcome, least.Reason = beam.NotApplicable, "9.6.3.1 does not call for stirrups; strength does"
		} else {
			least.Clause = e.stirrups.leastClause
			least.Compare(e.steelOf(web.least).Amount(), e.steelOf(web.provided).Amount())
		}
		along.Compare(q.Stirrups.Spacing.Amount(), e.lengthOf(s.along).Amount())
		if apart, reason, known := queryAcross(q); known {
			across.Reason = reason
			across.Compare(apart.Amount(), e.lengthOf(s.across).Amount())
		} else {
			across.Outcome, across.Reason = beam.NotJudged, "the distance between legs across the web is not given"
		}
	}
	if e.stirrups.across {
		return []beam.Check{least, along, across}
	}
	return []beam.Check{least, along}
}

// queryAcross is the distance between legs across the web: as given, or as the
// number of legs leaves it between the covers.
func queryAcross(q *beam.SectionQuery) (apart units.Length, reason string, known bool) {
	s := q.Stirrups
	switch {
	case !s.Across.IsZero():
		return s.Across, "", true
	case s.Legs == 0 || s.Cover.IsZero() || s.Diameter.IsZero():
		return apart, "", false
	}
	section := q.Section
	_, _ = beam.GeometryOf(&section) // the strip of a polygon
	return legSpacing(section.Width, s.Cover, s.Diameter, s.Legs), "legs spread evenly between the covers", true
}
