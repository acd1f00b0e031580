package beam

import (
	"math"

	"soffit.example/bars"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// leastSpacing is the closest that stirrups are set on site (common
// practice, no source).
var leastSpacing = units.Millimetre.Of(50)

// leastStirrups bounds the mass of stirrups from below, for tension steel at
// an effective depth: two legs at the widest spacing that the code could
// accept throughout. It sets that spacing as the widest tried.
func (s *search) leastStirrups(tie bars.Size, depth units.Length) float64 {
	s.widest = max(s.closestSteps(tie), int(s.p.Code.WidestSpacing(s.p.Problem, depth).Ratio(s.p.Brief.Preferences.SpacingBy)+1e-9))
	return s.uniformMass(tie, 2, s.widest)
}

// uniformMass is the mass of stirrups at one spacing from face to face, which
// it leaves as the current zones.
func (s *search) uniformMass(tie bars.Size, legs, k int) float64 {
	s.setUniform(tie, legs, k)
	return s.stirrupMass(tie)
}

// tensionDepth is the larger effective depth of the bars of the trial.
func (s *search) tensionDepth() units.Length {
	return s.t.EffectiveDepth(Positive).Max(s.t.EffectiveDepth(Negative))
}

// eachStirrup calls keep with the lightest passing zones of every number of
// legs for the bars of the trial, unless promising says that no zones of
// that mass could be kept. More legs are tried only while they buy a wider
// spacing. It reports whether any number of legs passes.
func (s *search) eachStirrup(tie bars.Size, promising func(mass float64) bool, keep func(zones []Zone, mass float64)) (any bool) {
	if !s.bendable(tie) {
		return false
	}
	before := 0
	for legs := 2; legs <= s.p.Brief.Preferences.MaxLegs; legs++ {
		if s.t.standingInHollows(tie, legs) > 0 {
			continue
		}
		uniform, ok := s.uniform(tie, legs)
		if !ok {
			continue
		}
		any = true
		if uniform <= before {
			break
		}
		before = uniform
		if !promising(s.uniformMass(tie, legs, s.widest)) {
			continue
		}
		mass := s.uniformMass(tie, legs, uniform)
		s.best = append(s.best[:0], s.zones...)
		if s.prefer != FewestMarks { // by which one zone always ranks before three
			mass = s.threeZones(tie, legs, uniform, mass, promising)
		}
		if promising(mass) {
			keep(s.best, mass)
		}
		if uniform == s.widest {
			break
		}
	}
	return any
}

// bendable reports whether stirrups of a size fit round the bars of the trial
// at all; if not, it logs why.
func (s *search) bendable(tie bars.Size) bool {
	least := s.closestSteps(tie)
	s.setUniform(tie, 2, least)
	s.t.Zones, s.t.ZoneBar = s.zones, append(s.t.ZoneBar[:0], tie)
	s.checks, s.failed = s.t.appendGeometry(s.checks[:0]), s.failed[:0]
	if s.sift(0) {
		return true
	}
	s.giveUp(tie, 2, least)
	return false
}

// giveUp logs the closest stirrups, which have just failed, and remembers the
// pair of the trial if none failed by less.
func (s *search) giveUp(tie bars.Size, legs, least int) {
	if !s.logs { // then it is logged already
		s.logStirrups(tie, legs, least, 1)
	}
	if worst := s.worst(); !s.near[0].ok || worst < s.near[0].worst {
		s.near[0] = near{ok: true, worst: worst, pair: s.current(tie)}
	}
}

// step is the spacing of k steps.
func (s *search) step(k int) units.Length {
	return s.p.Brief.Preferences.SpacingBy.Scale(float64(k))
}

// closestSteps is the least spacing tried, in steps: no closer than stirrups
// are set, and clear of each other as bars are.
func (s *search) closestSteps(tie bars.Size) int {
	least := leastSpacing.Max(tie.Diameter.Add(s.p.Code.Gaps(s.p.Problem).InLayer.Least))
	return int(math.Ceil(least.Ratio(s.p.Brief.Preferences.SpacingBy) - 1e-9))
}

// uniform is the widest passing spacing of one zone, in steps. A closer
// spacing never fails where a wider one passes. The bars tried one after the
// other are much alike, so the search starts where the last one ended.
func (s *search) uniform(tie bars.Size, legs int) (k int, ok bool) {
	least, most := s.closestSteps(tie), s.widest
	passes := func(k int) bool {
		s.setUniform(tie, legs, k)
		return s.try(tie, legs, k, 1)
	}
	if passes(most) {
		return most, true
	}
	k, ok = lastNear(min(max(s.hint, least), most-1), least, most-1, passes)
	if ok {
		s.hint = k
		return k, true
	}
	s.giveUp(tie, legs, least)
	return 0, false
}

// lastNear is the greatest k in [least, most] that passes, sought in growing
// strides from a guess. Where none passes, least is the last one tried.
func lastNear(guess, least, most int, passes func(int) bool) (k int, ok bool) {
	if least > most {
		return 0, least == most+1 && passes(least)
	}
	if passes(guess) {
		for stride := 1; guess < most; stride *= 2 {
			to := min(most, guess+stride)
			if !passes(to) {
				return last(guess, to-1, passes), true
			}
			guess = to
		}
		return guess, true
	}
	if guess == least || !passes(least) {
		return 0, false
	}
	for stride := 1; ; stride *= 2 {
		to := max(least, guess-stride)
		if to == least || passes(to) {
			return last(to, guess-1, passes), true
		}
		guess = to
	}
}

// last is the greatest k in [known, most] that passes, where known does.
func last(known, most int, passes func(int) bool) int {
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
	if s.logs {
		s.logStirrups(tie, legs, k, zones)
	}
	return false
}

// logStirrups logs the zones that just failed.
func (s *search) logStirrups(tie bars.Size, legs, k, zones int) {
	s.reject(Arrangement{Depth: s.p.Brief.Section.Depth, Bar: tie.Name, Legs: legs, Spacing: s.step(k), Zones: zones})
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

// threeZones looks for lighter stirrups than those in s.best, of a given
// mass, with close ends at a spacing and a wider middle. It returns the mass
// of the lightest and leaves them in s.best.
func (s *search) threeZones(tie bars.Size, legs, close int, mass float64, promising func(float64) bool) float64 {
	if !s.member || s.p.Brief.Preferences.MaxZones < 3 {
		return mass
	}
	mostLeft, mostRight := s.longestEnds(close)
	if mostLeft+mostRight == 0 || close >= s.widest {
		return mass
	}
	// The close stirrups passed over the whole length: only the middle is in
	// doubt.
	passes := func(wide, left, right int) bool {
		s.setThree(tie, legs, close, wide, left, right)
		s.t.Focus = 1 + min(left, 1)
		ok := s.try(tie, legs, wide, 3)
		s.t.Focus = 0
		return ok
	}
	widest := s.widest
	if !passes(widest, mostLeft, mostRight) {
		widest = last(close, widest-1, func(k int) bool { return passes(k, mostLeft, mostRight) })
	}
	// A longer end zone never fails where a shorter one passes, nor does a
	// closer middle: each search starts from the one before.
	left, right := mostLeft, mostRight
	for wide := widest; wide > close; wide-- {
		if m := s.uniformMass(tie, legs, wide); m >= mass || !promising(m) {
			break // with any close ends it would be heavier still
		}
		if wide == widest {
			left = mostLeft - last(0, mostLeft, func(cut int) bool { return passes(wide, mostLeft-cut, mostRight) })
			if left < mostRight && passes(wide, left, left) {
				right = left
			}
		} else {
			left = shrink(left, func(n int) bool { return passes(wide, n, right) })
		}
		right = shrink(right, func(n int) bool { return passes(wide, left, n) })
		s.setThree(tie, legs, close, wide, left, right)
		if m := s.stirrupMass(tie); m < mass {
			mass, s.best = m, append(s.best[:0], s.zones...)
		}
	}
	return mass
}

// endShare is how much of the clear length a zone of close stirrups may take
// at each end; a cantilever has one, of twice that, at the end that is held.
const endShare = 0.45

// longestEnds are the most spacings that the zones of close stirrups may
// have at each end.
func (s *search) longestEnds(close int) (left, right int) {
	n := s.to.Sub(s.from).Ratio(s.step(close)) * endShare
	supports := s.p.Brief.Supports
	switch {
	case supports[0].Kind == statics.Free:
		return 0, int(2 * n)
	case supports[len(supports)-1].Kind == statics.Free:
		return int(2 * n), 0
	}
	return int(n), int(n)
}

// shrink is the least n that passes, from one that does, by growing strides:
// it is mostly near.
func shrink(n int, passes func(int) bool) int {
	for stride := 1; n > 0; {
		to := max(0, n-stride)
		switch {
		case passes(to):
			n, stride = to, 2*stride
		case to == n-1:
			return n
		default:
			stride = 1
		}
	}
	return n
}

// stirrupMass is the mass of the current zones in kg; per metre of beam with
// demands.
func (s *search) stirrupMass(tie bars.Size) float64 {
	sum := 0.0
	for i := range s.zones {
		z := &s.zones[i]
		one := tie.Mass(s.t.stirrupLength(tie, z)).In(units.Kilogram)
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
	if b := s.laid[Bottom].set; b != nil {
		f.bottom = *b
	}
	if b := s.laid[Top].set; b != nil {
		f.top = *b
	}
	for _, face := range [2]Face{Bottom, Top} {
		if s.laid[face].inCompression {
			f.inCompress = face
		}
	}
	return f
}
