package statics

import (
	"math"

	"soffit.example/units"
)

// Extremes are the greatest and least forces over a length of a span, each with
// its place, its case or combination, and the other force acting with it.
// Least is the most negative, not the smallest in size.
type Extremes struct {
	MomentMost, MomentLeast Forces
	ShearMost, ShearLeast   Forces
}

// Extremes returns the extremes over the closed length between two places of
// the span. At a jump both one-sided values count, at the ends of the length
// too. Of equal extremes the leftmost is given. The error is a [*RangeError] if
// a place is off the span or to lies left of from.
func (l *Line) Extremes(from, to units.Length) (Extremes, error) {
	a, b, err := stretch(from, to, l.length())
	if err != nil {
		return Extremes{}, err
	}
	var p peaks
	l.scan(a, b, &p)
	return p.extremes(), nil
}

// stretch returns the two ends of a length of a span in m.
func stretch(from, to units.Length, length float64) (a, b float64, err error) {
	a, ok := onSpan(from.In(units.Metre), length)
	if !ok {
		return 0, 0, outside("from", units.DimLength, a, 0, length)
	}
	b, ok = onSpan(to.In(units.Metre), length)
	if !ok || !units.AtMost(a, b) {
		return 0, 0, outside("to", units.DimLength, b, a, length)
	}
	return a, max(a, b), nil
}

// peaks gathers the extremes of the states offered to it.
type peaks struct {
	mMost, mLeast, vMost, vLeast state
}

// offer takes a state where it exceeds what is held by more than rounding, so
// that of equals the first stays.
func (k *peaks) offer(s *state) {
	if k.mMost.line == nil {
		*k = peaks{*s, *s, *s, *s}
		return
	}
	if s.m-k.mMost.m > max(s.line.mNoise, k.mMost.line.mNoise) {
		k.mMost = *s
	}
	if k.mLeast.m-s.m > max(s.line.mNoise, k.mLeast.line.mNoise) {
		k.mLeast = *s
	}
	if s.v-k.vMost.v > max(s.line.vNoise, k.vMost.line.vNoise) {
		k.vMost = *s
	}
	if k.vLeast.v-s.v > max(s.line.vNoise, k.vLeast.line.vNoise) {
		k.vLeast = *s
	}
}

func (k *peaks) extremes() Extremes {
	return Extremes{
		MomentMost: k.mMost.forces(), MomentLeast: k.mLeast.forces(),
		ShearMost: k.vMost.forces(), ShearLeast: k.vLeast.forces(),
	}
}

// scan offers every state of the line in [a, b] that can be an extreme, from
// left to right: the ends, both sides of each breakpoint, and where the
// derivative of the shear or of the moment vanishes.
func (l *Line) scan(a, b float64, k *peaks) {
	last := len(l.pieces) - 1
	for i := l.pieceAt(a); i <= last && l.x[i] <= b; i++ {
		from, to := max(a, l.x[i]), min(b, l.x[i+1])
		start, end := l.inPiece(i, from), l.inPiece(i, to)
		if i > 0 && from == l.x[i] {
			_, start.side = l.pieces[i-1].sides(&l.pieces[i])
		}
		if i < last && to == l.x[i+1] {
			end.side, _ = l.pieces[i].sides(&l.pieces[i+1])
		}
		if to == l.x[i+1] && from == to {
			k.offer(&end)
			continue
		}
		k.offer(&start)
		if from == to {
			continue
		}
		p := &l.pieces[i]
		turns, n := p.turns()
		for _, t := range turns[:n] {
			if x := l.x[i] + t; from < x && x < to {
				k.offer(&state{x: x, v: p.shear(t), m: p.moment(t), line: l})
			}
		}
		k.offer(&end)
	}
}

// turns returns, in ascending order, the at most three places t where the
// derivative of the piece's shear or moment vanishes. They may lie outside it.
func (p *piece) turns() (t [3]float64, n int) {
	// V = 0 is (s/2) t² + w t - v = 0, solved without cancellation.
	a, b, c := p.s/2, p.w, -p.v
	if a == 0 {
		if b != 0 {
			t[0], n = -c/b, 1
		}
		return t, n
	}
	vertex := -b / p.s
	disc := b*b - 4*a*c
	if disc <= 0 {
		t[0] = vertex
		return t, 1
	}
	q := -(b + math.Copysign(math.Sqrt(disc), b)) / 2
	r1, r2 := q/a, c/q
	return [3]float64{min(r1, r2), vertex, max(r1, r2)}, 3
}
