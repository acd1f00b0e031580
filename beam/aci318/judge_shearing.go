package aci318

import (
	"slices"

	"soffit.example/beam"
	"soffit.example/units"
)

// judgeShearing appends the checks on one-way shear, on the ties of
// compression bars, and on the torque that may be neglected.
//
// Along a span the forces of each combination are followed exactly, between
// the critical sections of both ends: on each stretch without a change of load
// the greatest shear of each sense of bending is found, as d, the steel ratio
// and so Vc differ by sense. Where the detailed expression of 318-14 makes Vc
// vary along the beam, stations are judged in addition.
func (e *edition) judgeShearing(dst []beam.Check, t *beam.Trial) []beam.Check {
	if t.Forces.Spans() == 0 {
		dst = e.judgeDemandShear(dst, t)
	}
	for span := 1; span <= t.Forces.Spans(); span++ {
		dst = e.judgeSpanShear(dst, t, span)
	}
	dst = e.judgeTies(dst, t)
	return e.judgeTorsion(dst, t)
}

// judgeSpanShear judges every zone of a span, and every length of it that no
// zone reaches.
func (e *edition) judgeSpanShear(dst []beam.Check, t *beam.Trial, span int) []beam.Check {
	var room [48]units.Length
	s := newShearSpan(t, span)
	s.e, s.ends = e, shearEnds(t, span)
	breaks := t.Forces.Breaks(room[:0], span)
	if places := e.addPlaces(breaks, t, span); len(places) > len(breaks) {
		breaks = places
		slices.SortFunc(breaks, units.Length.Compare)
	}
	length := t.Brief.Spans[span-1]
	_, s.bends[0] = t.Forces.Moment(beam.Positive, span, units.Length{}, length)
	_, s.bends[1] = t.Forces.Moment(beam.Negative, span, units.Length{}, length)
	before := -1
	for k := range t.Zones {
		if !s.stirrups(k) {
			continue
		}
		from, to := t.Zones[k].From, s.reach(k)
		if !s.clearlyLess(from, s.right) || !s.clearlyLess(s.left, to) {
			continue
		}
		if t.Focus == 0 || t.Focus == k+1 {
			dst = s.judge(dst, breaks, k, t.Zones[k].Spacing, from, to, "")
			dst = e.judgeStirrups(dst, t, k, before)
		}
		before = k
	}
	note := noteGap
	if before < 0 {
		note = noteNoStirrups
	}
	for at := s.left; s.clearlyLess(at, s.right); {
		end, covered := s.cover(at)
		if !covered {
			dst = s.gap(dst, breaks, at, end, note)
		}
		at = end
	}
	dst = e.appendBent(dst, t, span, s.heavy)
	return appendLimit(dst, e, t, span, &s.limit, &s.limitWeb)
}

// judgeDemandShear judges each demand with each zone of stirrups, or without
// any.
func (e *edition) judgeDemandShear(dst []beam.Check, t *beam.Trial) []beam.Check {
	var limit worstSection
	var limitWeb webSteel
	zones := len(t.Zones)
	for k := range max(zones, 1) {
		note, spacing := "", units.Length{}
		if zones == 0 {
			k, note = -1, noteNoStirrups
		} else {
			spacing = t.Zones[k].Spacing
		}
		z := e.newWebZone(t, 0, k, spacing)
		z.note, z.local = note, true
		z.bends = demandSenses(t)
		z.leanAgainst(greatestDemand(t))
		for i := range t.Forces.Demands() {
			z.point(t.Forces.Demands()[i])
		}
		if z.limit.found && (!limit.found || z.limit.utilization > limit.utilization) {
			limit, limitWeb = z.limit, *z.webFor(z.limit.sense, z.limit.action.Shear)
		}
		dst = z.appendChecks(dst)
		if k >= 0 {
			dst = e.judgeStirrups(dst, t, k, k-1)
		}
	}
	return appendLimit(dst, e, t, 0, &limit, &limitWeb)
}

// greatestDemand is the greatest shear among the demands.
func greatestDemand(t *beam.Trial) (shear units.Force) {
	for i := range t.Forces.Demands() {
		if v := t.Forces.Demands()[i].Shear; shear.Abs().Less(v.Abs()) {
			shear = v
		}
	}
	return shear
}

// demandSenses are the senses that a demand without a moment may belong to:
// those that other demands bend, or else every sense with steel.
func demandSenses(t *beam.Trial) (bends [2]bool) {
	for i := range t.Forces.Demands() {
		m := t.Forces.Demands()[i].Moment.In(units.NewtonMetre)
		bends[0] = bends[0] || m > 0
		bends[1] = bends[1] || m < 0
	}
	if !bends[0] && !bends[1] {
		bends = [2]bool{t.Bottom.Count > 0, t.Top.Count > 0}
	}
	return bends
}

// shearSpan is a span while its zones are judged.
type shearSpan struct {
	t           *beam.Trial
	span        int
	left, right units.Length // faces of the supports
	slip        units.Length // what is no length, but rounding

	e     *edition
	ends  [2]shearEnd
	bends [2]bool // senses that bend it at all

	heavy    bool         // spacings are halved somewhere
	limit    worstSection // of the section limit, over all zones
	limitWeb webSteel
}

// noLength is the share of a span below which a length is rounding.
const noLength = 1e-9

func newShearSpan(t *beam.Trial, span int) shearSpan {
	s := shearSpan{t: t, span: span, slip: t.Brief.Spans[span-1].Scale(noLength)}
	s.left, s.right = t.Faces(span)
	return s
}

func (s *shearSpan) clearlyLess(a, b units.Length) bool { return a.Add(s.slip).Less(b) }

// stirrups reports whether zone k has stirrups in the span.
func (s *shearSpan) stirrups(k int) bool {
	z := &s.t.Zones[k]
	return z.Span == s.span && z.Legs > 0 && z.Count > 0 && z.Spacing.In(units.Metre) > 0
}

// reach is where zone k ends: where the layout says, but no further than half
// a spacing beyond its last stirrup.
func (s *shearSpan) reach(k int) units.Length {
	z := &s.t.Zones[k]
	last := z.From.Add(z.Spacing.Scale(float64(z.Count)))
	if s.clearlyLess(last, z.To) {
		return last
	}
	return z.To
}

// cover is how far the zones reach from a place in one piece; if none reaches
// it, where the next one begins.
func (s *shearSpan) cover(at units.Length) (end units.Length, covered bool) {
	end, next := at, s.right
	for k := range s.t.Zones {
		if !s.stirrups(k) {
			continue
		}
		from, to := s.t.Zones[k].From, s.reach(k)
		if !s.clearlyLess(from, to) || !s.clearlyLess(at, to) {
			continue
		}
		if s.clearlyLess(at, from) {
			next = next.Min(from)
			continue
		}
		end, covered = end.Max(to), true
	}
	if covered {
		return end, true
	}
	return next, false
}

// neighbours are the zones that end and begin where a length that no zone
// reaches begins and ends; -1 where none does.
func (s *shearSpan) neighbours(at, end units.Length) (before, after int) {
	before, after = -1, -1
	for k := range s.t.Zones {
		if !s.stirrups(k) {
			continue
		}
		if reach := s.reach(k); !s.clearlyLess(reach, at) && !s.clearlyLess(at, reach) {
			before = k
		}
		if from := s.t.Zones[k].From; !s.clearlyLess(from, end) && !s.clearlyLess(end, from) {
			after = k
		}
	}
	return before, after
}

// apart is how far the stirrups on either side of a length that no zone reaches
// are apart, or the nearest one from its far end.
func (s *shearSpan) apart(at, end units.Length) units.Length {
	d := end.Sub(at)
	before, after := s.neighbours(at, end)
	for _, k := range [2]int{before, after} {
		if k >= 0 {
			d = d.Add(s.t.Zones[k].Spacing.Scale(0.5))
		}
	}
	return d
}

// gap judges a length that no zone reaches, by how far the stirrups on either
// side of it are apart. At the end of a span a zone goes on to the face as long
// as its first stirrup is no further from it than a spacing; between two zones
// the weaker stirrups are judged at the distance that they are apart, as long
// as that is no more than two spacings of the wider. Anything else is bare.
func (s *shearSpan) gap(dst []beam.Check, breaks []units.Length, at, end units.Length, note string) []beam.Check {
	before, after := s.neighbours(at, end)
	apart := s.apart(at, end)
	switch {
	case before < 0 && after < 0:
	case before < 0 || after < 0:
		k := max(before, after)
		if spacing := s.t.Zones[k].Spacing; apart.AtMost(spacing) {
			return s.judge(dst, breaks, k, spacing, at, end, "")
		}
	case apart.AtMost(s.t.Zones[before].Spacing.Max(s.t.Zones[after].Spacing).Scale(2)):
		return s.judge(dst, breaks, s.weaker(before, after), apart, at, end, noteBetween)
	}
	return s.judge(dst, breaks, -1, units.Length{}, at, end, note)
}

// weaker is the zone of two whose stirrups count for less between them: open
// ones, or those of less area.
func (s *shearSpan) weaker(a, b int) int {
	if open := s.t.Zones[b].Open(); open != s.t.Zones[a].Open() {
		if open {
			return b
		}
		return a
	}
	if s.t.ZoneBar[b].Area.Scale(float64(s.t.Zones[b].Legs)).Less(s.t.ZoneBar[a].Area.Scale(float64(s.t.Zones[a].Legs))) {
		return b
	}
	return a
}

// judge judges the length between two places with the stirrups of zone k at a
// spacing, or with none. Where a force jumps at an end of a zone, both sides of the jump
// count.
func (s *shearSpan) judge(dst []beam.Check, breaks []units.Length, k int, spacing, from, to units.Length, note string) []beam.Check {
	z := s.e.newWebZone(s.t, s.span, k, spacing)
	z.note, z.bends = note, s.bends
	f := &s.t.Forces
	if z.leaning {
		z.leanAgainst(s.greatest(breaks, from, to))
	}
	for i := range f.Combinations() {
		z.combination = i
		z.from, z.near = s.ends[0].start(f, i, s.span)
		z.to, z.far = s.ends[1].start(f, i, s.span)
		if z.to.Less(z.from) {
			z.from, z.to = s.left, s.right
		}
		lo, hi := z.from, z.to
		if s.clearlyLess(lo, from) {
			lo = from.Min(z.to)
			z.point(f.Action(i, s.span, lo, false))
		}
		if s.clearlyLess(to, hi) {
			hi = to.Max(z.from)
			z.point(f.Action(i, s.span, hi, true))
		}
		z.follow(i, lo, hi, breaks)
	}
	z.settle()
	if z.torsion.on && !z.torsion.needed {
		z.torsion.needed = z.nearTorsion(from, to)
	}
	if z.limit.found && (!s.limit.found || z.limit.utilization > s.limit.utilization) {
		s.limit, s.limitWeb = z.limit, *z.webFor(z.limit.sense, z.limit.action.Shear)
	}
	s.heavy = s.heavy || z.heavy
	return z.appendChecks(dst)
}

// greatest is the greatest shear between two places, by the ends of the loads
// there.
func (s *shearSpan) greatest(breaks []units.Length, from, to units.Length) (shear units.Force) {
	f := &s.t.Forces
	meet := func(at units.Length) {
		for i := range f.Combinations() {
			for _, right := range [2]bool{false, true} {
				if v := f.Action(i, s.span, at, right).Shear; shear.Abs().Less(v.Abs()) {
					shear = v
				}
			}
		}
	}
	meet(from)
	for _, b := range breaks {
		if from.Less(b) && b.Less(to) {
			meet(b)
		}
	}
	meet(to)
	return shear
}
