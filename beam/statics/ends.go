package statics

import "math"

// ends is what the supports put on one span, in N and N-m: the forces, positive
// upward, and the bending moments at the very ends, outside any load that acts
// there.
type ends struct {
	rA, rB, mA, mB float64
}

// endSums adds up what loads put on the ends of a span of length l: the forces
// as if the span were simply supported, the moments as if it were clamped.
type endSums struct {
	l              float64
	rA, rB, mA, mB float64
}

// point adds a force and a couple at x. The factors are the influence lines of
// the simple span's reactions and the clamped span's end moments, for a force
// P at a = x and b = l-x (AISC Steel Construction Manual, Table 3-23, cases 8
// and 17):
//
//	rA = P b/l    rB = P a/l    mA = -P a b²/l²    mB = -P a² b/l²
//
// and their derivatives with respect to a for a couple.
func (s *endSums) point(x, force, couple float64) {
	a, b := x/s.l, (s.l-x)/s.l
	s.rA += force*b - couple/s.l
	s.rB += force*a + couple/s.l
	s.mA -= force*s.l*a*b*b + couple*b*(b-2*a)
	s.mB -= force*s.l*a*a*b + couple*a*(2*b-a)
}

// add adds an action. A strip is replaced by forces at the three points of
// Gauss and Legendre: their rule is exact to the fifth degree, and a linear
// load times a cubic influence line is of the fourth.
func (s *endSums) add(a *action) {
	if !a.isStrip() {
		s.point(a.from, a.force, a.couple)
		return
	}
	half, mid := (a.to-a.from)/2, (a.from+a.to)/2
	w, dw := (a.w+a.wEnd)/2, (a.wEnd-a.w)/2
	r := math.Sqrt(3.0 / 5.0)
	s.point(mid-half*r, half*5/9*(w-dw*r), 0)
	s.point(mid, half*8/9*w, 0)
	s.point(mid+half*r, half*5/9*(w+dw*r), 0)
}

// under returns the ends of the span on supports of the given kinds, which
// hold it. Releasing one clamped end of a prismatic span carries half its
// moment over to the other.
func (s *endSums) under(left, right SupportKind) ends {
	var e ends
	switch {
	case left == Free:
		return ends{rB: s.rA + s.rB, mB: -s.rA * s.l}
	case right == Free:
		return ends{rA: s.rA + s.rB, mA: -s.rB * s.l}
	case left == Fixed && right == Fixed:
		e.mA, e.mB = s.mA, s.mB
	case left == Fixed:
		e.mA = s.mA + s.mB/2
	case right == Fixed:
		e.mB = s.mB + s.mA/2
	}
	e.rA = s.rA + (e.mB-e.mA)/s.l
	e.rB = s.rB - (e.mB-e.mA)/s.l
	return e
}
