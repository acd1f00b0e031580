package aci318

import (
	"math"

	"soffit.example/bars"
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

// sections is how many parts a stretch is cut into where Vc varies along it.
const sections = 16

// worstSection is the section found worst in one respect.
type worstSection struct {
	found       bool
	utilization float64
	sense       beam.Sense
	action      beam.Action
	values      sectionShear
	note        string
}

// take keeps a section if it is worse than what is held.
func (w *worstSection) take(utilization float64, sense beam.Sense, a *beam.Action, s *sectionShear, note string) {
	if w.found && utilization <= w.utilization {
		return
	}
	*w = worstSection{true, utilization, sense, *a, *s, note}
}

// webZone is a stretch of beam with like stirrups, or with none, while it is
// judged.
type webZone struct {
	e     *edition
	t     *beam.Trial
	span  int // zero with demands given directly
	zone  int // of Trial.Zones; -1: no stirrups
	note  string
	web   [2]webSteel // positive and negative bending
	bends [2]bool     // senses that bend the span at all
	// local says that Vc depends on the forces themselves, so that the
	// greatest shear of a sense need not be its worst section.
	local bool

	// The first and last section of the span that are designed for their own
	// shear under the combination being followed, and what was decided there.
	from, to  units.Length
	near, far string

	legs units.Length // between legs, across the beam

	peak                     [2]peakShear
	strength, limit, trigger worstSection
	along, across            worstSection // of the sections where stirrups are required
}

// peakShear is the greatest shear met in one sense.
type peakShear struct {
	found  bool
	shear  float64 // N
	action beam.Action
	note   string
}

// newWebZone prepares a stretch; zone is -1 where there are no stirrups.
func (e *edition) newWebZone(t *beam.Trial, span, zone int) webZone {
	z := webZone{e: e, t: t, span: span, zone: zone}
	b := &t.Brief
	z.local = !e.shear.rowsByStirrups && b.Readings.ShearMethod == beam.DetailedShear
	s := shearSection{
		strength: b.Concrete.Strength, lambda: e.lambda(&b.Concrete),
		width: b.Section.Width, gross: b.Section.Depth,
		row: b.Readings.ShearRow, method: b.Readings.ShearMethod,
	}
	s.stirrups.yield = b.Reinforcement.StirrupYield
	if zone >= 0 {
		s.stirrups.area = bars.TotalArea(bars.Group{Size: t.ZoneBar[zone], Count: t.Zones[zone].Legs})
		s.stirrups.spacing = t.Zones[zone].Spacing
		z.legs = legSpacing(b.Section.Width, t.Cover, t.ZoneBar[zone].Diameter, t.Zones[zone].Legs)
	}
	for i, sense := range [2]beam.Sense{beam.Positive, beam.Negative} {
		s.depth = t.EffectiveDepth(sense)
		s.area = t.Steel(sense.TensionFace()).Area
		z.web[i] = e.newWebSteel(&s)
	}
	return z
}

func senseIndex(s beam.Sense) int { return int(s) - 1 }

// offer evaluates a section and keeps it where it is the worst.
func (z *webZone) offer(sense beam.Sense, a *beam.Action, note string) {
	web := &z.web[senseIndex(sense)]
	s := web.at(z.e, shearForces{shear: a.Shear, moment: a.Moment, axial: a.Axial})
	z.strength.take(ratio(s.shear, s.design), sense, a, &s, note)
	z.limit.take(ratio(s.shear, s.limit), sense, a, &s, note)
	z.trigger.take(ratio(s.shear, s.trigger), sense, a, &s, note)
	if s.required && z.zone >= 0 {
		z.along.take(ratio(web.s, s.along), sense, a, &s, note)
		z.across.take(ratio(z.e.lengthIn(z.legs), s.across), sense, a, &s, note)
	}
}

// ratio is a utilization that stays finite.
func ratio(demand, capacity float64) float64 {
	switch {
	case demand <= 0:
		return 0
	case capacity <= 0:
		return beam.Hopeless
	}
	return min(demand/capacity, beam.Hopeless)
}

// meet takes a section into account.
func (z *webZone) meet(sense beam.Sense, a *beam.Action) {
	note := z.noteAt(a.At)
	if z.local {
		z.offer(sense, a, note)
		return
	}
	p := &z.peak[senseIndex(sense)]
	if v := math.Abs(a.Shear.In(units.Newton)); !p.found || v > p.shear {
		*p = peakShear{true, v, *a, note}
	}
}

// noteAt is what to say of a section: why it is judged without stirrups, or
// what was decided of the end of the span it stands for.
func (z *webZone) noteAt(at units.Length) string {
	switch {
	case z.note != "":
		return z.note
	case z.span > 0 && at == z.from:
		return z.near
	case z.span > 0 && at == z.to:
		return z.far
	}
	return ""
}

// exceeds reports whether a shear is above what its sense has met.
func (z *webZone) exceeds(sense beam.Sense, shear float64) bool {
	p := &z.peak[senseIndex(sense)]
	return !p.found || math.Abs(shear) > p.shear
}

// point meets a single section, whose sense follows from its moment; without
// one, every sense that bends the span.
func (z *webZone) point(a beam.Action) {
	m := a.Moment.In(units.NewtonMetre)
	if m >= 0 && (m > 0 || z.bends[0]) {
		z.meet(beam.Positive, &a)
	}
	if m <= 0 && (m < 0 || z.bends[1]) {
		z.meet(beam.Negative, &a)
	}
}

// follow meets the sections of combination i between two places.
func (z *webZone) follow(i int, from, to units.Length, breaks []units.Length) {
	at := from
	for _, b := range breaks {
		if at.Less(b) && b.Less(to) {
			z.stretch(i, at, b)
			at = b
		}
	}
	z.stretch(i, at, to)
}

// stretch meets the sections between two places without a change of load
// between them.
func (z *webZone) stretch(i int, from, to units.Length) {
	f := &z.t.Forces
	a := f.Action(i, z.span, from, true)
	b := f.Action(i, z.span, to, false)
	length := to.Sub(from).In(units.Metre)
	if !(length > 0) {
		z.point(a)
		z.point(b)
		return
	}
	s := loadedStretch{i: i, from: from, to: to, shearStretch: newShearStretch(length,
		a.Moment.In(units.NewtonMetre), a.Shear.In(units.Newton), b.Moment.In(units.NewtonMetre), b.Shear.In(units.Newton))}
	parts, n := s.parts()
	for _, p := range parts[:n] {
		if p.sign > 0 || p.sign == 0 && z.bends[0] {
			z.part(beam.Positive, &s, p)
		}
		if p.sign < 0 || p.sign == 0 && z.bends[1] {
			z.part(beam.Negative, &s, p)
		}
	}
}

// loadedStretch is a stretch of a span under combination i.
type loadedStretch struct {
	shearStretch
	i        int
	from, to units.Length
}

// part meets the sections of a part of a stretch that is bent in one sense.
func (z *webZone) part(sense beam.Sense, s *loadedStretch, p signedPart) {
	z.station(sense, s, p.from)
	if t, ok := s.vertex(p.from, p.to); ok {
		z.station(sense, s, t)
	}
	if z.local {
		step := (p.to - p.from) / sections
		for k := 1; k < sections; k++ {
			z.station(sense, s, p.from+float64(k)*step)
		}
	}
	z.station(sense, s, p.to)
}

// station meets the section at t of a stretch.
func (z *webZone) station(sense beam.Sense, s *loadedStretch, t float64) {
	if !z.local && !z.exceeds(sense, s.shear(t)) {
		return
	}
	at, right := s.from.Add(units.Metre.Of(t)), true
	if t >= s.length {
		at, right = s.to, false
	}
	a := z.t.Forces.Action(s.i, z.span, at, right)
	z.meet(sense, &a)
}

// settle evaluates what was met.
func (z *webZone) settle() {
	for i := range z.peak {
		if p := &z.peak[i]; p.found {
			z.offer(beam.Sense(i+1), &p.action, p.note)
		}
	}
}

// judgeSpanShear judges every zone of a span, and every length of it that no
// zone reaches.
func (e *edition) judgeSpanShear(dst []beam.Check, t *beam.Trial, span int) []beam.Check {
	var room [48]units.Length
	s := newShearSpan(t, span)
	s.e, s.ends = e, shearEnds(t, span)
	breaks := t.Forces.Breaks(room[:0], span)
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
		dst = s.judge(dst, breaks, k, from, to, "")
		dst = e.judgeStirrups(dst, t, k, before)
		before = k
	}
	note := noteGap
	if before < 0 {
		note = noteNoStirrups
	}
	for at := s.left; s.clearlyLess(at, s.right); {
		end, covered := s.cover(at)
		if !covered {
			dst = s.judge(dst, breaks, -1, at, end, note)
		}
		at = end
	}
	return appendLimit(dst, e, t, span, &s.limit, &s.limitWeb)
}

// judgeDemandShear judges each demand with each zone of stirrups, or without
// any.
func (e *edition) judgeDemandShear(dst []beam.Check, t *beam.Trial) []beam.Check {
	var limit worstSection
	var limitWeb webSteel
	zones := len(t.Zones)
	for k := range max(zones, 1) {
		note := ""
		if zones == 0 {
			k, note = -1, noteNoStirrups
		}
		z := e.newWebZone(t, 0, k)
		z.note, z.local = note, true
		z.bends = demandSenses(t)
		for i := range t.Forces.Demands() {
			z.point(t.Forces.Demands()[i])
		}
		if z.limit.found && (!limit.found || z.limit.utilization > limit.utilization) {
			limit, limitWeb = z.limit, z.web[senseIndex(z.limit.sense)]
		}
		dst = z.appendChecks(dst)
		if k >= 0 {
			dst = e.judgeStirrups(dst, t, k, k-1)
		}
	}
	return appendLimit(dst, e, t, 0, &limit, &limitWeb)
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

// judge judges the length between two places with the stirrups of zone k, or
// with none. Where a force jumps at an end of a zone, both sides of the jump
// count.
func (s *shearSpan) judge(dst []beam.Check, breaks []units.Length, k int, from, to units.Length, note string) []beam.Check {
	z := s.e.newWebZone(s.t, s.span, k)
	z.note, z.bends = note, s.bends
	f := &s.t.Forces
	for i := range f.Combinations() {
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
	if z.limit.found && (!s.limit.found || z.limit.utilization > s.limit.utilization) {
		s.limit, s.limitWeb = z.limit, z.web[senseIndex(z.limit.sense)]
	}
	return z.appendChecks(dst)
}
