package aci318

import (
	"soffit.example/beam"
	"soffit.example/units"
)

// torsionZone is what a webZone knows of torsion; all of it is idle where no
// torque must be designed for.
type torsionZone struct {
	on       bool
	needed   bool         // torsion needs stirrups in the zone, or within bt + d of it
	reach    units.Length // bt + d
	strength torsionStrength
	cage     torsionCage
	legs     float64
	leg      float64 // of an outer leg: area over spacing; zero where it does not count
	unfit    string  // why the stirrups do not count

	section, transverse worstTorsion
}

// worstTorsion is the section found worst in one respect.
type worstTorsion struct {
	found       bool
	utilization float64
	sense       beam.Sense
	action      beam.Action
	values      sectionTorsion
	shear       sectionShear
	note        string
}

// take keeps a section if it is worse than what is held.
func (w *worstTorsion) take(utilization float64, sense beam.Sense, a *beam.Action, v *sectionTorsion, s *sectionShear, note string) {
	if w.found && utilization <= w.utilization {
		return
	}
	*w = worstTorsion{true, utilization, sense, *a, *v, *s, note}
}

// Why stirrups do not count in torsion.
const (
	noteNoTies          = "there are no stirrups, and torsion needs closed ones here or within bt + d (9.7.6.3.2)"
	noteOpen            = "torsion needs closed stirrups, and these are open"
	noteTorsionInclined = "torsion needs stirrups square to the axis of the beam, and these are inclined"
)

// readyTorsion prepares a zone whose stirrups are spacing apart for torsion.
func (z *webZone) readyTorsion(spacing units.Length) {
	e, t, q := z.e, z.t, &z.torsion
	q.on, q.reach = true, torsionReach(t)
	z.local = true // torque and shear are greatest at different places
	q.strength = e.problemTorsion(t.Problem)
	tie := t.Stirrup.Diameter
	q.legs, q.unfit = 2, noteNoTies
	if z.zone >= 0 {
		zone := &t.Zones[z.zone]
		tie, q.legs, q.unfit = t.ZoneBar[z.zone].Diameter, float64(max(2, zone.Legs)), ""
		switch {
		case zone.Open():
			q.unfit = noteOpen
		case zone.Angle != 0 && zone.Angle != 90:
			q.unfit = noteTorsionInclined
		default:
			q.leg = e.areaIn(t.ZoneBar[z.zone].Area) / e.lengthIn(spacing)
		}
	}
	q.cage = e.trialCage(t, &q.strength, tie)
}

// offerTorsion evaluates a section under its torque, if that is not neglected,
// and keeps it where it is the worst.
func (z *webZone) offerTorsion(sense beam.Sense, a *beam.Action, web *webSteel, s *sectionShear, note string) {
	q := &z.torsion
	if a.Span == 0 {
		q.strength.load(z.e, a.Axial)
	}
	own := q.strength.torque(z.e, a)
	near := z.reaching(a, own)
	if near.neglected {
		return
	}
	q.needed = true
	lift := 0.0
	if z.hanger != nil {
		lift = web.lifting(z.e, s, hungLoad(z.t.Problem, z.span, a.Combination, a.At)).lift
	}
	v := q.cage.at(near, web, s, q.legs, lift)
	if v.broken != "" {
		q.section.take(beam.NoCapacity, sense, a, &v, s, note)
		q.transverse.take(beam.NoCapacity, sense, a, &v, s, note)
		return
	}
	q.transverse.take(ratio(v.outer, q.leg), sense, a, &v, s, note)
	if own.neglected {
		return
	}
	if near.distant {
		v = q.cage.at(own, web, s, q.legs, lift)
	}
	q.section.take(ratio(v.stress, v.limit), sense, a, &v, s, note)
}

// appendTorsion appends the checks on torsion of a stretch.
func (z *webZone) appendTorsion(dst []beam.Check) []beam.Check {
	q := &z.torsion
	if !q.on {
		return dst
	}
	if !q.needed {
		return append(dst, beam.Check{
			ID: "torsion.transverse", Clause: "9.5.4.3", Span: z.span, Outcome: beam.NotApplicable,
			Reason: "the torque is below φTth here and over bt + d on either side (9.5.4.1, 9.7.6.3.2)",
		})
	}
	if q.section.found {
		dst = z.appendSection(dst)
	}
	if q.transverse.found {
		dst = z.appendTransverse(dst)
	}
	dst = z.appendClosed(dst)
	if z.zone < 0 {
		return dst
	}
	return z.appendTorsionSpacing(dst)
}

// refuse fails a check that has no values to compare.
func refuse(c *beam.Check, reason string) {
	c.Outcome, c.Utilization, c.Reason = beam.Fail, beam.NoCapacity, reason
}

// check begins the check of a section, which fails at once where the section
// has no strength in torsion.
func (w *worstTorsion) check(id, clause string, span int) (c beam.Check, sound bool) {
	c = beam.Check{
		ID: id, Clause: clause, Reason: w.note,
		Span: span, At: w.action.At, HasAt: span > 0, Combination: w.action.Combination,
	}
	if w.values.broken != "" {
		refuse(&c, w.values.broken)
		return c, false
	}
	return c, true
}

func (z *webZone) appendSection(dst []beam.Check) []beam.Check {
	e, w := z.e, &z.torsion.section
	c, sound := w.check("torsion.section", "22.7.7.1", z.span)
	if !sound {
		return append(dst, c)
	}
	c.Compare(e.stressOf(w.values.stress).Amount(), e.stressOf(w.values.limit).Amount())
	if z.t.Record {
		c.Steps = z.adequacySteps(w)
	}
	return append(dst, c)
}

func (z *webZone) appendTransverse(dst []beam.Check) []beam.Check {
	e, w := z.e, &z.torsion.transverse
	c, sound := w.check("torsion.transverse", "9.5.4.3", z.span)
	if !sound {
		return append(dst, c)
	}
	c.Compare(e.steelOf(w.values.outer).Amount(), e.steelOf(z.torsion.leg).Amount())
	switch {
	case z.torsion.unfit != "":
		c.Reason = z.torsion.unfit
	case w.values.shed > 0:
		c.Reason = noteShed
	case w.values.distant:
		c.Reason = noteReach
	}
	if z.t.Record {
		c.Steps = z.transverseSteps(w)
	}
	return append(dst, c)
}

const noteShed = "the torque that compatibility imposes is reduced to φTcr (22.7.3.2): the neighbours must take the rest"

// appendClosed asks for closed stirrups square to the axis.
func (z *webZone) appendClosed(dst []beam.Check) []beam.Check {
	c := beam.Check{ID: "torsion.closed", Clause: "25.7.1.6", Span: z.span}
	wrong := 0.0
	if z.torsion.unfit != "" {
		wrong, c.Reason = 1, z.torsion.unfit
	}
	c.Compare(units.Plain(wrong), units.Plain(0))
	return append(dst, c)
}

// appendTorsionSpacing asks for the least stirrups of 9.6.4.2, for their
// spacing along the beam, and for bars that are thick enough for it.
func (z *webZone) appendTorsionSpacing(dst []beam.Check) []beam.Check {
	e, web, q := z.e, &z.web[0], &z.torsion
	c := beam.Check{ID: "torsion.minimum-stirrups", Clause: "9.6.4.2", Span: z.span}
	c.Compare(e.steelOf(web.least).Amount(), e.steelOf(web.provided).Amount())
	if q.unfit != "" {
		refuse(&c, q.unfit)
	}
	if z.t.Record {
		c.Steps = z.leastTorsionSteps()
	}
	dst = append(dst, c)

	c = beam.Check{ID: "torsion.spacing-along", Clause: "9.7.6.3.3", Span: z.span}
	c.Compare(e.lengthOf(web.s).Amount(), e.lengthOf(q.cage.along).Amount())
	if z.t.Record {
		c.Steps = q.cage.spacingSteps(e, web.s)
	}
	dst = append(dst, c)

	c = beam.Check{ID: "torsion.bar-diameter", Clause: "9.7.5.2", Span: z.span}
	c.Compare(e.leastTorsionBar(e.lengthOf(web.s)).Amount(), smallestRound(z.t).Amount())
	if z.t.Record {
		c.Steps = e.barDiameterSteps(web.s, e.lengthIn(smallestRound(z.t)))
	}
	return append(dst, c)
}

// leastTorsionBar is the least diameter of bars with stirrups at a spacing.
func (e *edition) leastTorsionBar(spacing units.Length) units.Length {
	return spacing.Scale(barShare).Max(e.lengthOf(e.torsion.bar))
}

// smallestRound is the diameter of the smallest bar inside the stirrups at the
// top and the bottom, nil where a face has none.
func smallestRound(t *beam.Trial) units.Length {
	if len(t.Bottom.Fit.Bars) == 0 || len(t.Top.Fit.Bars) == 0 {
		return units.Length{}
	}
	return smallestBar(&t.Bottom).Min(smallestBar(&t.Top))
}
