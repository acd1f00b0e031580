package beam

import (
	"math"

	"soffit.example/bars"
	"soffit.example/units"
)

// leastSpacing is the closest that stirrups are set on site (common
// practice, no source).
var leastSpacing = units.Millimetre.Of(50)

// eachStirrup calls keep with the lightest passing zones of every number of
// legs for the bars of the trial. More legs are tried only while they buy a
// wider spacing.
func (s *search) eachStirrup(tie bars.Size, keep func(zones []Zone, mass float64)) {
	widest := 0
	for legs := 2; legs <= s.p.Brief.Preferences.MaxLegs; legs++ {
		uniform, ok := s.uniform(tie, legs)
		if !ok {
			continue
		}
		if uniform <= widest {
			return
		}
		widest = uniform
		s.setUniform(tie, legs, uniform)
		best, mass := append([]Zone(nil), s.zones...), s.stirrupMass(tie)
		if zones, m, ok := s.threeZones(tie, legs, uniform); ok && m < mass {
			best, mass = zones, m
		}
		keep(best, mass)
	}
}

// step is the spacing of k steps.
func (s *search) step(k int) units.Length {
	return s.p.Brief.Preferences.SpacingBy.Scale(float64(k))
}

// steps are the least and the greatest number of spacing steps tried.
func (s *search) steps() (least, most int) {
	by := s.p.Brief.Preferences.SpacingBy
	least = int(math.Ceil(leastSpacing.Ratio(by) - 1e-9))
	return least, max(least, int(s.p.Brief.Section.Depth.Ratio(by)+1e-9))
}

// uniform is the widest passing spacing of one zone, in steps. A closer
// spacing never fails where a wider one passes.
func (s *search) uniform(tie bars.Size, legs int) (k int, ok bool) {
	least, most := s.steps()
	s.setUniform(tie, legs, least)
	if !s.try(tie, legs, least, 1) {
		if worst := s.worst(); !s.near[0].ok || worst < s.near[0].worst {
			s.near[0] = near{ok: true, worst: worst, pair: s.current(tie)}
		}
		return 0, false
	}
	return s.last(least, most, func(k int) bool {
		s.setUniform(tie, legs, k)
		return s.try(tie, legs, k, 1)
	}), true
}

// last is the greatest k in [known, most] that passes, where known does.
func (s *search) last(known, most int, passes func(int) bool) int {
	for known < most {
		mid := (known + most + 1) / 2
		if passes(mid) {
			known = mid
		} else {
			most = mid - 1
		}
	}
	return known
}

// try judges the current zones and logs them if they fail.
func (s *search) try(tie bars.Size, legs, k, zones int) bool {
	s.t.Zones, s.t.ZoneBar = s.zones, append(s.t.ZoneBar[:0], tie, tie, tie)[:len(s.zones)]
	if s.judge(0, Shearing) {
		return true
	}
	s.reject(Arrangement{Depth: s.p.Brief.Section.Depth, Bar: tie.Name, Legs: legs, Spacing: s.step(k), Zones: zones})
	return false
}

// setUniform puts one zone from face to face.
func (s *search) setUniform(tie bars.Size, legs, k int) {
	s.zones = s.zones[:0]
	s.addZone(tie, legs, s.step(k), s.from, s.to)
}

// setThree puts zones of close stirrups over left and right spacings at the
// ends, and wide ones between.
func (s *search) setThree(tie bars.Size, legs, close, wide, left, right int) {
	s.zones = s.zones[:0]
	a := s.from.Add(s.step(close).Scale(float64(left)))
	b := s.to.Sub(s.step(close).Scale(float64(right)))
	if left > 0 {
		s.addZone(tie, legs, s.step(close), s.from, a)
	}
	s.addZone(tie, legs, s.step(wide), a, b)
	if right > 0 {
		s.addZone(tie, legs, s.step(close), b, s.to)
	}
}

func (s *search) addZone(tie bars.Size, legs int, spacing, from, to units.Length) {
	z := Zone{Bar: tie.Name, Legs: legs, Spacing: spacing, Form: "closed"}
	if s.member {
		z.Span, z.From, z.To = 1, from, to
		z.Count = stirrupCount(z)
	}
	s.zones = append(s.zones, z)
}

// stirrupCount is how many stirrups a zone needs so that, spread evenly, none
// are further apart than its spacing.
func stirrupCount(z Zone) int {
	return max(1, int(math.Ceil(z.To.Sub(z.From).Ratio(z.Spacing)-1e-9)))
}

// widerSteps is how many of the widest middle spacings are tried with end
// zones of their own.
const widerSteps = 3

// threeZones looks for lighter stirrups with close ends at the given spacing
// and a wider middle. The zones returned are a copy.
func (s *search) threeZones(tie bars.Size, legs, close int) (best []Zone, mass float64, ok bool) {
	if !s.member || s.p.Brief.Preferences.MaxZones < 3 {
		return nil, 0, false
	}
	_, most := s.steps()
	longest := int(s.to.Sub(s.from).Ratio(s.step(close)) * 0.45)
	if longest < 1 {
		return nil, 0, false
	}
	passes := func(wide, left, right int) bool {
		s.setThree(tie, legs, close, wide, left, right)
		return s.try(tie, legs, wide, 3)
	}
	widest := s.last(close, most, func(k int) bool { return passes(k, longest, longest) })
	for wide := widest; wide > close && wide > widest-widerSteps; wide-- {
		// The shortest end zone on each side; a longer one never fails where
		// a shorter one passes.
		left := longest - s.last(0, longest, func(cut int) bool { return passes(wide, longest-cut, longest) })
		right := longest - s.last(0, longest, func(cut int) bool { return passes(wide, left, longest-cut) })
		if !passes(wide, left, right) {
			continue
		}
		if m := s.stirrupMass(tie); !ok || m < mass {
			best, mass, ok = append(best[:0], s.zones...), m, true
		}
	}
	return best, mass, ok
}

// stirrupMass is the mass of the current zones in kg; per metre of beam with
// demands.
func (s *search) stirrupMass(tie bars.Size) float64 {
	sum := 0.0
	for i := range s.zones {
		z := &s.zones[i]
		one := tie.Mass(s.t.stirrupLength(tie, z.Legs)).In(units.Kilogram)
		if s.member {
			sum += one * float64(z.Count)
		} else {
			sum += one / z.Spacing.In(units.Metre)
		}
	}
	return sum
}

// current is the trial as a layout that may not pass.
func (s *search) current(tie bars.Size) found {
	f := found{stirrup: tie, zones: append([]Zone(nil), s.zones...)}
	for _, face := range [2]Face{Bottom, Top} {
		b := &f.bottom
		if face == Top {
			b = &f.top
		}
		for _, r := range s.t.Steel(face).Rows {
			b.add(r.Layer-1, r.Size, r.Count)
		}
		if s.t.Steel(face).InCompression {
			f.inCompress = face
		}
	}
	return f
}
