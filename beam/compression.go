package beam

import (
	"context"

	"soffit.example/bars"
	"soffit.example/units"
)

// compressed looks for tension sets at a face that pass once bars on the
// other face are relied on in compression: of each size the fewest that do,
// or more where the stirrups have legs to hold.
//
// Sets that are hopeless inside one stirrup are left out inside the thicker
// ones that follow, which only move bars away from the face.
func (s *search) compressed(ctx context.Context, tie bars.Size, face Face, hopeless map[barPlan]bool) error {
	sense := tensionSense(face)
	if !s.bent(sense) {
		return nil
	}
	var sets []barSet
	others := make([][]barSet, len(s.main)) // by size, fewest bars first
	for i := range s.main {
		most, _, _ := s.bounds(sense, tie, &s.main[i])
		uniform := uniformSets(nil, &s.main[i], 2, most, s.p.Brief.Preferences.MaxLayers)
		sets = append(sets, s.flangeRoom(face, tie, &s.main[i]).withFlange(uniform, &s.main[i], units.Area{}, s.p.Brief.Preferences.SpacingBy)...)
		others[i] = uniformSets(nil, &s.main[i], 2, most, 1)
	}
	sortSets(sets)
	s.t.enclose(tie, s.main[len(s.main)-1])
	lightest := s.leastStirrups(tie, s.p.Brief.Section.Depth)
	for i := range sets {
		if err := ctx.Err(); err != nil {
			return err
		}
		b := &sets[i]
		if hopeless[b.barPlan] || !s.promising(b, &barSet{}, lightest) {
			continue
		}
		if !s.helped(tie, face, b, others) {
			hopeless[b.barPlan] = true
			continue
		}
		for _, of := range others {
			s.compress(tie, face, b, of, lightest)
		}
		if s.done() {
			return nil
		}
	}
	return nil
}

// farOff is the utilization beyond which the most steel of another size, much
// the same in amount and in depth, would not help either.
const farOff = 1.5

// helped reports whether the most steel of one of the largest sizes in
// compression makes a tension set pass in its own sense. Less would not.
func (s *search) helped(tie bars.Size, face Face, b *barSet, others [][]barSet) bool {
	tried := 0
	for i := len(others) - 1; i >= 0 && tried < 3; i-- {
		n := len(others[i])
		if n == 0 {
			continue
		}
		o := &others[i][n-1]
		if s.presses(tie, face, b, o) && s.judge(face, Bending) {
			return true
		}
		if tried++; tried == 1 {
			s.rejectPressed(tie, face, b, o)
			if s.worst() > farOff {
				return false
			}
		}
	}
	return false
}

// rejectPressed logs a tension set with compression steel by the checks that
// have just failed.
func (s *search) rejectPressed(tie bars.Size, face Face, b, other *barSet) {
	a := s.arrangement(face, b, tie.Name)
	layers, _ := other.names()
	a.Pressed = layers[0]
	s.reject(a)
}

// compress completes a tension set with bars of one size in compression. In
// the sense that they help, more of them never fail where fewer pass; what they
// do to the other sense and to the fit is judged count by count.
func (s *search) compress(tie bars.Size, face Face, b *barSet, of []barSet, lightest float64) {
	n := len(of)
	helps := func(o *barSet) bool { return s.presses(tie, face, b, o) && s.judge(face, Bending) }
	if n == 0 || !s.promising(b, &of[0], lightest) || !helps(&of[n-1]) {
		return
	}
	first := n - 1 - last(0, n-1, func(fewer int) bool { return helps(&of[n-1-fewer]) })
	for i := first; i < n; i++ {
		o := &of[i]
		if !s.promising(b, o, lightest) {
			return
		}
		if !s.relied(tie, face, b, o) {
			s.rejectPressed(tie, face, b, o)
			continue
		}
		bottom, top := b, o
		if face == Top {
			bottom, top = o, b
		}
		if s.shear(tie, bottom, top, face.Opposite()) || o.count >= s.p.Brief.Preferences.MaxLegs {
			return
		}
	}
}

// presses lays a tension set with compression steel opposite.
func (s *search) presses(tie bars.Size, face Face, b, other *barSet) bool {
	bottom, top := b, other
	if face == Top {
		bottom, top = other, b
	}
	return s.layPair(tie, bottom, top, face.Opposite())
}

// relied judges a tension set with compression steel opposite.
func (s *search) relied(tie bars.Size, face Face, b, other *barSet) bool {
	return s.presses(tie, face, b, other) && s.judge(0, Bending, Fitting)
}
