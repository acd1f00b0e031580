package statics

import (
	"iter"
	"slices"

	"soffit.example/units"
)

// noise is the rounding that a force may carry, as a share of the load (times
// the span length for a moment).
const noise = 1e-13

// A Side tells which of two values at a jump is meant.
type Side uint8

const (
	Both  Side = iota // no jump there, or an end of the span
	Left              // just left of the jump
	Right             // just right of it
)

// String returns "both", "left" or "right".
func (s Side) String() string {
	switch s {
	case Left:
		return "left"
	case Right:
		return "right"
	}
	return "both"
}

// Forces are the internal forces at one place of a span, acting together.
type Forces struct {
	ID     string       // the case or combination
	At     units.Length // from the left end of the span
	Side   Side
	Moment units.Moment // sagging positive
	Shear  units.Force  // positive when the left part pushes up
}

// A Piece is one length of a [Line] between neighbouring breakpoints, with the
// values just inside its ends. With t from From, h = To - From, and
// s = (IntensityEnd - Intensity)/h,
//
//	V(t) = Shear - Intensity t - s t²/2
//	M(t) = Moment + Shear t - Intensity t²/2 - s t³/6
type Piece struct {
	From, To                units.Length
	Intensity, IntensityEnd units.LineLoad
	Shear, ShearEnd         units.Force
	Moment, MomentEnd       units.Moment
}

// A Line is the shear and the bending moment along one span, under one case or
// combination: an exact piecewise polynomial. It does not change once made and
// may be read from several goroutines. A Line comes from a [Response].
type Line struct {
	id     string
	x      []float64 // breakpoints in m, one more than pieces; shared by all lines of a span
	pieces []piece
	vNoise float64 // N, what rounding alone may put into a shear
	mNoise float64 // N-m, and into a moment
}

// piece is one length of a line in N and m, with t from its left breakpoint.
type piece struct {
	v, m       float64 // shear and moment at t = 0
	w, s       float64 // load at t = 0, and its slope
	vEnd, mEnd float64 // shear and moment at the right breakpoint
}

func (p *piece) shear(t float64) float64  { return p.v - t*(p.w+t*p.s/2) }
func (p *piece) moment(t float64) float64 { return p.m + t*(p.v-t*(p.w/2+t*p.s/6)) }

// addScaled adds f times q, which belongs to the same length.
func (p *piece) addScaled(q *piece, f float64) {
	p.v += f * q.v
	p.m += f * q.m
	p.w += f * q.w
	p.s += f * q.s
	p.vEnd += f * q.vEnd
	p.mEnd += f * q.mEnd
}

// length is the span's in m, and zero for a line that is none.
func (l *Line) length() float64 {
	if len(l.x) == 0 {
		return 0
	}
	return l.x[len(l.x)-1]
}

// ID is the case or combination that the line belongs to.
func (l *Line) ID() string { return l.id }

// Length is the length of the span.
func (l *Line) Length() units.Length { return units.Metre.Of(l.length()) }

// Pieces yields the pieces of the line from left to right.
func (l *Line) Pieces() iter.Seq[Piece] {
	return func(yield func(Piece) bool) {
		for i := range l.pieces {
			p := &l.pieces[i]
			h := l.x[i+1] - l.x[i]
			more := yield(Piece{
				From: units.Metre.Of(l.x[i]), To: units.Metre.Of(l.x[i+1]),
				Intensity: units.NewtonPerMetre.Of(p.w), IntensityEnd: units.NewtonPerMetre.Of(p.w + p.s*h),
				Shear: units.Newton.Of(p.v), ShearEnd: units.Newton.Of(p.vEnd),
				Moment: units.NewtonMetre.Of(p.m), MomentEnd: units.NewtonMetre.Of(p.mEnd),
			})
			if !more {
				return
			}
		}
	}
}

// At returns the forces just left and just right of a place on the span. They
// differ only at a point load or a couple between the ends; at an end both are
// the value just inside. The error is a [*RangeError] if the place is off the
// span.
func (l *Line) At(place units.Length) (left, right Forces, err error) {
	x, ok := onSpan(place.In(units.Metre), l.length())
	if !ok {
		return Forces{}, Forces{}, outside("at", units.DimLength, x, 0, l.length())
	}
	i := l.pieceAt(x)
	a := l.inPiece(i, x)
	if x < l.x[i+1] || i+1 == len(l.pieces) {
		left = a.forces()
		return left, left, nil
	}
	b := l.inPiece(i+1, x)
	a.side, b.side = l.pieces[i].sides(&l.pieces[i+1])
	return a.forces(), b.forces(), nil
}

// pieceAt returns the first piece whose right breakpoint is not left of x.
func (l *Line) pieceAt(x float64) int {
	i, _ := slices.BinarySearch(l.x[1:], x)
	return min(i, len(l.pieces)-1)
}

// state is the forces of a line at one place, in SI units.
type state struct {
	x, v, m float64
	side    Side
	line    *Line
}

// inPiece returns the state at x seen from within piece i.
func (l *Line) inPiece(i int, x float64) state {
	p := &l.pieces[i]
	switch x {
	case l.x[i]:
		return state{x: x, v: p.v, m: p.m, line: l}
	case l.x[i+1]:
		return state{x: x, v: p.vEnd, m: p.mEnd, line: l}
	}
	t := x - l.x[i]
	return state{x: x, v: p.shear(t), m: p.moment(t), line: l}
}

// sides tells on which sides of the breakpoint between it and the next piece
// the end of a piece and the start of the next stand.
func (p *piece) sides(next *piece) (end, start Side) {
	if p.vEnd == next.v && p.mEnd == next.m {
		return Both, Both
	}
	return Left, Right
}

// forces returns the state in its quantities. What rounding alone could have
// left is given as zero.
func (s *state) forces() Forces {
	return Forces{
		ID: s.line.id, At: units.Metre.Of(s.x), Side: s.side,
		Shear:  units.Newton.Of(flush(s.v, s.line.vNoise)),
		Moment: units.NewtonMetre.Of(flush(s.m, s.line.mNoise)),
	}
}

// flush returns v, or zero where v is not beyond the noise.
func flush(v, noise float64) float64 {
	if -noise <= v && v <= noise {
		return 0
	}
	return v
}
