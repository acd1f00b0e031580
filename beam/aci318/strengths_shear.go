package aci318

import (
	"soffit.example/beam"
	"soffit.example/units"
)

// queryWeb prepares the section for shear: ρw counts the layers in flexural
// tension, and d is the depth of their centroid.
func (e *edition) queryWeb(q *beam.SectionQuery, f *beam.FlexureStrength) webSteel {
	s := shearSection{
		strength: q.Concrete.Strength, lambda: e.lambda(&q.Concrete),
		width: q.Section.Width, gross: q.Section.Depth,
		depth: f.EffectiveDepth, area: f.TensionSteel,
		row: q.Readings.ShearRow, method: q.Readings.ShearMethod,
	}
	if t := q.Stirrups; t != nil {
		s.stirrups = stirrupSteel{area: t.Area, spacing: t.Spacing, yield: t.Yield}
	}
	return e.newWebSteel(&s)
}

func (e *edition) shearStrength(web *webSteel, s *sectionShear) beam.ShearStrength {
	v := beam.ShearStrength{
		Concrete: e.forceOf(s.concrete.strength), ConcreteRow: s.concrete.row.String(),
		SizeEffect: 1, SteelRatio: web.bare.ratio,
		Steel: e.forceOf(web.steel), Nominal: e.forceOf(s.nominal), Phi: web.phi, Design: e.forceOf(s.design),
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
	say(web.fytCapped, "the stirrups count with "+e.stress.Format(e.stressOf(e.materials.mostShearYield))+" of their yield strength ("+e.materials.yieldClause+")")
	say(s.concrete.rootCapped, "√f'c is capped for Vc, as there are not the least stirrups (22.5.3.1)")
	say(s.concrete.axialCapped, "the axial term is capped at 0.05 f'c (22.5.5.1.2)")
	say(web.av > 0 && !web.enough, "the stirrups are fewer or wider than least reinforcement, so that Vc is that of a beam without them")
	return v
}

// queryShear judges the shear of a demand.
func (e *edition) queryShear(q *beam.SectionQuery, v *beam.ShearStrength, web *webSteel, s *sectionShear) []beam.Check {
	shear := q.Demand.Shear.Abs().Amount()
	strength := beam.Check{ID: "shear.strength", Clause: "22.5.1.1", Combination: q.Demand.Name}
	strength.Compare(shear, v.Design.Amount())
	limit := beam.Check{ID: "shear.section-limit", Clause: "22.5.1.2", Combination: q.Demand.Name}
	limit.Compare(shear, v.SectionLimit.Amount())
	return append([]beam.Check{strength, limit}, e.queryStirrups(q, web, s)...)
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
		if q.Stirrups.Across.IsZero() {
			across.Outcome, across.Reason = beam.NotJudged, "the distance between legs across the web is not given"
		} else {
			across.Compare(q.Stirrups.Across.Amount(), e.lengthOf(s.across).Amount())
		}
	}
	if e.stirrups.across {
		return []beam.Check{least, along, across}
	}
	return []beam.Check{least, along}
}
