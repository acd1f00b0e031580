package aci318

import (
	"math"

	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/units"
)

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
	// local says that the greatest shear of a sense need not be its worst
	// section: Vc depends on the forces themselves, or a torque acts too.
	local bool

	// Stirrups that lean count against the shear of one sign, that of the
	// greatest shear of the stretch; for the other the loose webs hold.
	leaning bool
	against int // risesLeft or risesRight
	loose   *[2]webSteel

	bentBars bool         // the span has bent bars,
	bent     [2]bentShare // which carry this at the sections being met, by their rise,
	bentAt   units.Length // of which this is one
	heavy    bool         // spacings are halved somewhere

	hanger *hangerSection // nil: nothing hangs on the span

	// The combination being followed, the first and last section of the span
	// that are designed for their own shear under it, and what was decided there.
	combination int
	from, to    units.Length
	near, far   string

	legs units.Length // between legs, across the beam

	torsion torsionZone
	varies  bool // Vc depends on the forces

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
func (e *edition) newWebZone(t *beam.Trial, span, zone int, spacing units.Length) webZone {
	z := webZone{e: e, t: t, span: span, zone: zone}
	b := &t.Brief
	s := e.shearSection(&b.Section, &t.Geometry, &b.Concrete, &b.Readings)
	s.stirrups.yield = b.Reinforcement.StirrupYield
	if zone >= 0 {
		s.stirrups.area = bars.TotalArea(bars.Group{Size: t.ZoneBar[zone], Count: t.Zones[zone].Legs})
		s.stirrups.spacing = spacing
		s.stirrups.angle = t.Zones[zone].Angle
		z.leaning = s.stirrups.angle != 0 && s.stirrups.angle != 90
		z.legs = legSpacing(b.Section.Width, t.Cover, t.ZoneBar[zone].Diameter, t.Zones[zone].Legs)
	}
	if z.leaning {
		z.loose = new([2]webSteel)
	}
	for i, sense := range [2]beam.Sense{beam.Positive, beam.Negative} {
		steel := tensionSteel(t, sense)
		s.depth, s.area = steel.depth, steel.area
		z.web[i] = e.newWebSteel(&s)
		if z.leaning {
			without := s
			without.stirrups = stirrupSteel{yield: s.stirrups.yield, angle: s.stirrups.angle}
			z.loose[i] = e.newWebSteel(&without)
		}
	}
	z.bentBars = hasBent(t, span)
	if span > 0 && hungLoads(b, span) {
		z.hanger = new(hangerSection)
	}
	z.varies = !e.shear.rowsByStirrups && b.Readings.ShearMethod == beam.DetailedShear || z.leaning || z.bentBars || z.hanger != nil
	z.local = z.varies
	if t.Twisted {
		z.readyTorsion(spacing)
	}
	return z
}

// webFor is the web under a shear: with the stirrups, unless they lean the
// wrong way.
func (z *webZone) webFor(sense beam.Sense, shear units.Force) *webSteel {
	if z.leaning && !shear.IsZero() && against(shear) != z.against {
		return &z.loose[senseIndex(sense)]
	}
	return &z.web[senseIndex(sense)]
}

func senseIndex(s beam.Sense) int { return int(s) - 1 }

// leanAgainst says which shear leaning stirrups stand against.
func (z *webZone) leanAgainst(shear units.Force) { z.against = against(shear) }

// bentGroups are the bent bars that carry shear at a section.
func (z *webZone) bentGroups(w *worstSection) (groups []bentGroup) {
	d := z.e.bentDepth(z.t)
	for i := range z.t.Bent {
		if rises(&z.t.Bent[i]) != against(w.action.Shear) || !z.e.bentCounts(z.t, i, z.span, w.values.bentAt) {
			continue
		}
		if g := z.e.bentGroup(z.t, i); g.share(d) != (bentShare{}) {
			groups = append(groups, g)
		}
	}
	return groups
}

// offer evaluates a section and keeps it where it is the worst.
func (z *webZone) offer(sense beam.Sense, a *beam.Action, note string) {
	web := z.webFor(sense, a.Shear)
	f := shearForces{shear: a.Shear, moment: a.Moment, axial: a.Axial}
	if z.bentBars {
		f.bent = z.bent[against(a.Shear)]
	}
	s := web.at(z.e, f)
	s.bentAt = z.bentAt
	z.strength.take(ratio(s.shear, s.design), sense, a, &s, note)
	z.limit.take(ratio(s.shear, s.limit), sense, a, &s, note)
	z.trigger.take(ratio(s.shear, s.trigger), sense, a, &s, note)
	if s.required && z.zone >= 0 {
		z.along.take(ratio(web.s, s.along), sense, a, &s, note)
		z.across.take(ratio(z.e.lengthIn(z.legs), s.across), sense, a, &s, note)
	}
	z.heavy = z.heavy || s.heavy
	if z.hanger != nil {
		z.lift(sense, web, a, &s, note)
	}
	if z.torsion.on {
		z.offerTorsion(sense, a, web, &s, note)
	}
}

// ratio is a utilization that stays finite.
func ratio(demand, capacity float64) float64 {
	switch {
	case demand <= 0:
		return 0
	case capacity <= 0:
		return beam.NoCapacity
	}
	return min(demand/capacity, beam.NoCapacity)
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
	z.seekBent(a.At)
	z.meets(a)
}

// seekBent finds what bent bars carry at the sections about to be met, by one
// of them that lies within no end of their reach.
func (z *webZone) seekBent(at units.Length) {
	if z.bentBars {
		z.bent, z.bentAt = z.e.bentAt(z.t, z.span, at), at
	}
}

// meets is point with the bent bars known.
func (z *webZone) meets(a beam.Action) {
	sign := a.Moment.Compare(units.Moment{})
	if z.takes(beam.Positive, sign) {
		z.meet(beam.Positive, &a)
	}
	if z.takes(beam.Negative, sign) {
		z.meet(beam.Negative, &a)
	}
}

// takes reports whether sections with a moment of a sign are judged as bent in a
// sense. Torque alone is judged with the bottom bars.
func (z *webZone) takes(sense beam.Sense, sign int) bool {
	if sense == beam.Negative {
		return sign < 0 || sign == 0 && z.bends[1]
	}
	return sign > 0 || sign == 0 && (z.bends[0] || z.torsion.on && !z.bends[1])
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
	if z.torsion.on {
		z.meetTorques(from, to)
	}
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
	z.seekBent(from.Add(to).Scale(0.5))
	s := loadedStretch{i: i, from: from, to: to, shearStretch: newShearStretch(length,
		a.Moment.In(units.NewtonMetre), a.Shear.In(units.Newton), b.Moment.In(units.NewtonMetre), b.Shear.In(units.Newton))}
	parts, n := s.parts()
	for _, p := range parts[:n] {
		if z.takes(beam.Positive, p.sign) {
			z.part(beam.Positive, &s, p)
		}
		if z.takes(beam.Negative, p.sign) {
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
	if z.varies || z.local && s.curved() {
		step := (p.to - p.from) / sections
		for k := 1; k < sections; k++ {
			z.station(sense, s, p.from+float64(k)*step)
		}
	}
	if z.torsion.on && s.curved() {
		z.meetCurve(sense, s, p)
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
