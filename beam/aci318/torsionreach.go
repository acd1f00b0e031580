package aci318

import (
	"soffit.example/beam"
	"soffit.example/units"
)

// The stirrups that torsion needs at a section go on for bt + d beyond it
// (9.7.6.3.2). So a section must have, beside what its own shear needs, what the
// greatest torque within bt + d of it needs under the same combination. Where
// the sections near a support are designed for the torque at d from its face,
// the torques nearer than that count no more here than there.

const noteReach = "the torque is that of a section within bt + d of this one, whose stirrups go on to here (9.7.6.3.2)"

// torsionReach is bt + d, with bt the width of the strip that the stirrups stand
// in and d the greater of both faces.
func torsionReach(t *beam.Trial) units.Length {
	d := t.EffectiveDepth(beam.Positive).Max(t.EffectiveDepth(beam.Negative))
	if d.IsZero() {
		d = t.Brief.Section.Depth
	}
	return t.Brief.Section.Width.Add(d)
}

// nearTorsion reports whether torsion needs stirrups between two places of the
// span, or within bt + d of them.
func (z *webZone) nearTorsion(from, to units.Length) bool {
	left, right := z.t.Faces(z.span)
	from, to = from.Sub(z.torsion.reach).Max(left), to.Add(z.torsion.reach).Min(right)
	if !from.Less(to) {
		return false
	}
	near := false
	eachTorque(&z.t.Forces, z.span, from, to, func(a beam.Action) {
		q := z.torsion.strength.torque(z.e, &a)
		near = near || !q.neglected
	})
	return near
}

// reaching is the greatest torque within bt + d of a section whose own is
// given. It is neglected where all of them are.
func (z *webZone) reaching(a *beam.Action, own sectionTorque) sectionTorque {
	worst := own
	if a.Span == 0 {
		return worst
	}
	// By no length that counts more than bt + d, so that rounding does not leave
	// out the greater torque on the far side of a section where it jumps.
	reach := z.torsion.reach.Add(z.t.Brief.Spans[z.span-1].Scale(noLength))
	from, to := a.At.Sub(reach).Max(z.from), a.At.Add(reach).Min(z.to)
	combinationTorque(&z.t.Forces, z.combination, z.span, from, to, func(b beam.Action) {
		q := z.torsion.strength.torque(z.e, &b)
		if !q.neglected && (worst.neglected || q.used > worst.used) {
			worst, worst.distant = q, b.At != a.At
		}
	})
	return worst
}

// meetTorques meets the sections of combination i between two places of the span
// at which the torque that counts is extreme or changes its expression, and
// those bt + d away from such a place: there what a section needs may be extreme
// although neither end of the stretch between two changes of load is.
func (z *webZone) meetTorques(from, to units.Length) {
	q := &z.torsion
	first, last := from.Sub(q.reach).Max(z.from), to.Add(q.reach).Min(z.to)
	if !first.Less(last) {
		return
	}
	before, begun := beam.Action{}, false
	combinationTorque(&z.t.Forces, z.combination, z.span, first, last, func(a beam.Action) {
		if begun && before.At.Less(a.At) {
			z.meetTurns(from, to, &before, &a)
		}
		z.meetAround(from, to, a.At)
		before, begun = a, true
	})
}

// meetTurns meets the places between two sections, with no torque brought in
// between them, where a torque passes one of its limits.
func (z *webZone) meetTurns(from, to units.Length, a, b *beam.Action) {
	e, t := z.e, &z.torsion.strength
	qa, qb := t.torque(e, a), t.torque(e, b)
	if qa.neglected && qb.neglected {
		return
	}
	all := torqueEnds{e.momentIn(a.Torque), e.momentIn(b.Torque)}
	own := torqueEnds{e.momentIn(a.Torque.Sub(a.Compatible)), e.momentIn(b.Torque.Sub(b.Compatible))}
	least, crack := t.phi*t.threshold, t.phi*t.cracking
	for _, line := range [3]struct {
		torqueEnds
		level float64
	}{{all, least}, {own, least}, {all, crack}} {
		for _, level := range [2]float64{line.level, -line.level} {
			if (line.from-level)*(line.to-level) < 0 {
				share := (level - line.from) / (line.to - line.from)
				z.meetAround(from, to, a.At.Add(b.At.Sub(a.At).Scale(share)))
			}
		}
	}
}

// meetAround meets a place, and those bt + d before and beyond it, as far as
// they lie within a stretch.
func (z *webZone) meetAround(from, to, at units.Length) {
	for _, x := range [3]units.Length{at.Sub(z.torsion.reach), at, at.Add(z.torsion.reach)} {
		if from.Less(x) && x.Less(to) {
			z.point(z.t.Forces.Action(z.combination, z.span, x, true))
		}
	}
}
