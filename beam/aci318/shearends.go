package aci318

import (
	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// shearEnd is one end of a span: from where its sections are designed for the
// shear acting on them. Where 9.4.3.2 permits it, sections between the face of
// the support and d from it take the shear at d.
type shearEnd struct {
	face     units.Length
	critical units.Length // d from the face, or the face itself
	note     string       // what was decided
	left     bool
	uneven   bool         // the span carries loads that are not spread evenly
	length   units.Length // of the span
}

// What is said of the critical section.
const (
	noteAtDepth       = "sections nearer the face of the support take the shear at d from it (9.4.3.2)"
	noteFreeEnd       = "a free end: every section takes its own shear"
	noteHungSupport   = "shear at the face, not at d: the reaction does not compress the end of the beam (9.4.3.2(a))"
	noteHungLoad      = "shear at the face, not at d: a load hangs below the top of the beam (9.4.3.2(b))"
	noteLoadInDepth   = "shear at the face, not at d: a concentrated load acts between the two (9.4.3.2(c))"
	noteTorqueInDepth = "shear and torque at the face, not at d: a concentrated torque acts between the two (9.4.4.3)"
	noteNoSteel       = "shear at the face: there is no steel in tension to measure d to"
	notePulled        = "shear at the face, not at d: under this combination the reaction pulls (9.4.3.2(a))"
	noteNoStirrups    = "judged without stirrups: there are none"
	noteGap           = "judged without stirrups: no zone of the layout reaches this length"
	noteTooWide       = "the stirrups are further apart than Table 9.7.6.2.2 allows and are not counted"
	noteBetween       = "between two zones: the spacing is the distance of the stirrups on either side"
	noteNotRequired   = "stirrups are not required here: Vu is below the shear that calls for them, and below φVc"
	noteForStrength   = "9.6.3.1 does not ask for least stirrups here; strength does"
	noteHook          = "a standard hook round a bar develops stirrups of this size and strength"
)

// shearEnds decides both ends of a span.
func shearEnds(t *beam.Trial, span int) (ends [2]shearEnd) {
	left, right := t.Faces(span)
	ends[0] = shearEnd{face: left, critical: left, left: true}
	ends[1] = shearEnd{face: right, critical: right}
	for i := range ends {
		ends[i].decide(t, span, &t.Brief.Supports[span-1+i])
	}
	return ends
}

// decide finds the critical section of an end from the beam itself; whether
// the reaction pushes is seen to combination by combination.
func (s *shearEnd) decide(t *beam.Trial, span int, support *beam.Support) {
	switch {
	case support.Kind == statics.Free:
		s.note = noteFreeEnd
		return
	case support.Hung:
		s.note = noteHungSupport
		return
	case hungLoads(&t.Brief, span):
		s.note = noteHungLoad
		return
	}
	d := s.depth(t, span)
	if d.IsZero() {
		s.note = noteNoSteel
		return
	}
	critical := s.inward(d)
	if concentrated(&t.Brief, span, s.face, critical) {
		s.note = noteLoadInDepth
		return
	}
	if t.Twisted && concentratedTorque(&t.Brief, span, s.face, critical) {
		s.note = noteTorqueInDepth
		return
	}
	s.critical, s.note = critical, noteAtDepth
	s.uneven, s.length = uneven(&t.Brief, span), t.Brief.Spans[span-1]
}

// inward is the place at a distance from the face into the span.
func (s *shearEnd) inward(by units.Length) units.Length {
	if s.left {
		return s.face.Add(by)
	}
	return s.face.Sub(by)
}

// depth is the least d of the senses that bend the end region, which gives the
// critical section nearest the face.
func (s *shearEnd) depth(t *beam.Trial, span int) units.Length {
	from, to := s.face, s.inward(t.Brief.Section.Depth)
	if !s.left {
		from, to = to, from
	}
	to = to.Min(t.Brief.Spans[span-1])
	from = from.Max(units.Length{})
	var least units.Length
	for _, sense := range [2]beam.Sense{beam.Positive, beam.Negative} {
		if _, bends := t.Forces.Moment(sense, span, from, to); !bends {
			continue
		}
		d := tensionSteel(t, sense).depth
		if d.IsZero() {
			return units.Length{}
		}
		if least.IsZero() || d.Less(least) {
			least = d
		}
	}
	return least
}

// start is the end's critical section under combination i, and what was
// decided.
func (s *shearEnd) start(f *beam.Forces, i, span int) (units.Length, string) {
	if s.critical == s.face {
		return s.face, s.note
	}
	shear := f.Action(i, span, s.face, s.left).Shear
	if !s.left {
		shear = shear.Neg()
	}
	if shear.Less(units.Force{}) {
		return s.face, notePulled
	}
	if s.uneven && s.loadedNear(f, i, span, shear) {
		return s.face, noteLoadInDepth
	}
	return s.critical, s.note
}

// loadedNear reports whether a combination loads the beam between the face and
// the critical section so much more than evenly that 9.4.3.2(c) must be taken
// to speak of it.
func (s *shearEnd) loadedNear(f *beam.Forces, i, span int, atFace units.Force) bool {
	inside := f.Action(i, span, s.critical, s.left).Shear
	if !s.left {
		inside = inside.Neg()
	}
	total := f.Action(i, span, units.Length{}, true).Shear.Sub(f.Action(i, span, s.length, false).Shear)
	share := evenShare * s.critical.Sub(s.face).Abs().Ratio(s.length)
	return total.Scale(share).Less(atFace.Sub(inside))
}

// hungLoads reports a load applied at or below the soffit of a span.
func hungLoads(b *beam.Brief, span int) bool {
	for i := range b.Loads {
		if l := &b.Loads[i]; l.Hung && (l.Span == 0 || l.Span == span) {
			return true
		}
	}
	return false
}

// concentrated reports a point load or a couple on the span between two places,
// the second of them included. What distributed loads do there is seen to
// combination by combination.
func concentrated(b *beam.Brief, span int, face, critical units.Length) bool {
	for i := range b.Loads {
		l := &b.Loads[i]
		if l.Span != 0 && l.Span != span {
			continue
		}
		if l.Shape != beam.PointLoad && l.Shape != beam.Couple || l.Force.IsZero() && l.Moment.IsZero() {
			continue
		}
		if between(l.At, face, critical) {
			return true
		}
	}
	return false
}

// concentratedTorque is the same of a torque at one place.
func concentratedTorque(b *beam.Brief, span int, face, critical units.Length) bool {
	for i := range b.Loads {
		l := &b.Loads[i]
		if l.Shape == beam.Torque && (l.Span == 0 || l.Span == span) && !l.Moment.IsZero() && between(l.At, face, critical) {
			return true
		}
	}
	return false
}

// between reports whether a place lies beyond the face of a support and no
// further than the critical section.
func between(at, face, critical units.Length) bool {
	from := at.Sub(face)
	if critical.Less(face) {
		from = from.Neg()
	}
	return !from.AtMost(units.Length{}) && from.AtMost(critical.Sub(face).Abs())
}

// uneven reports a load on the span that is not spread evenly over it.
func uneven(b *beam.Brief, span int) bool {
	for i := range b.Loads {
		if l := &b.Loads[i]; l.Shape == beam.Partial && (l.Span == 0 || l.Span == span) {
			return true
		}
	}
	return false
}
