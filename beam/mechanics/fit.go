package mechanics

import (
	"fmt"
	"math"
)

const (
	fitTolerance = 1e-9  // of the greatest stress
	thinnest     = 1e-10 // fraction of the ultimate strain
	mostPieces   = 2000
)

// fit returns cubic pieces for a stress f, in Pa, of the fraction of the ultimate
// strain, between joints at which f may kink or jump. Pieces are halved until
// each agrees with f.
func fit(f func(s float64) float64, joints []float64) ([]piece, error) {
	const samples = 512
	var greatest float64
	for i := range samples + 1 {
		s := joints[len(joints)-1] * float64(i) / samples
		v := f(s)
		if !(v >= 0 && v <= mostStress) {
			return nil, &InputError{Field: fmt.Sprintf("stress at %.6g of the ultimate strain", s),
				Value: fmt.Sprintf("%v Pa", v), Allowed: "from 0 to 1e9 MPa"}
		}
		greatest = math.Max(greatest, v)
	}
	if greatest < leastStress {
		return nil, &InputError{Field: "greatest stress", Value: fmt.Sprintf("%v Pa", greatest), Allowed: "at least 1 Pa"}
	}
	var pieces []piece
	for i := range len(joints) - 1 {
		from, to := joints[i], joints[i+1]
		// The value just inside an end, so that a jump at a joint belongs to
		// neither side.
		inset := 1e-15 * to
		left, right := f(from+inset), f(to-inset)
		var err error
		if pieces, err = fitBetween(pieces, f, from, to, left, right, fitTolerance*greatest); err != nil {
			return nil, err
		}
	}
	return pieces, nil
}

// fitBetween appends the pieces for f between from and to, whose values there
// are left and right.
func fitBetween(pieces []piece, f func(float64) float64, from, to, left, right, tolerance float64) ([]piece, error) {
	w := to - from
	p := cubicThrough(left, f(from+w/4), f(to-w/4), right, w)
	worst := 0.0
	for _, t := range [...]float64{0.03, 0.12, 0.4, 0.5, 0.6, 0.88, 0.97} {
		worst = math.Max(worst, math.Abs(p.at(t*w)-f(from+t*w)))
	}
	if worst <= tolerance { // which what is not a number is not
		return append(pieces, piece{from: from, stress: p}), nil
	}
	if w < thinnest || len(pieces) > mostPieces {
		return nil, fmt.Errorf("the stress is too rough to fit at %.9g of the ultimate strain: list its kinks and jumps", from)
	}
	mid := from + w/2
	middle := f(mid)
	pieces, err := fitBetween(pieces, f, from, mid, left, middle, tolerance)
	if err != nil {
		return nil, err
	}
	return fitBetween(pieces, f, mid, to, middle, right, tolerance)
}

// cubicThrough returns the cubic with values a, b, c, d at 0, w/4, 3w/4 and w,
// the extremes and ends of Chebyshev's cubic, by Newton's divided differences.
func cubicThrough(a, b, c, d, w float64) polynomial {
	x1, x2, x3 := w/4, 3*w/4, w
	ab, bc, cd := (b-a)/x1, (c-b)/(x2-x1), (d-c)/(x3-x2)
	abc, bcd := (bc-ab)/x2, (cd-bc)/(x3-x1)
	abcd := (bcd - abc) / x3
	return polynomial{a, ab - abc*x1 + abcd*x1*x2, abc - abcd*(x1+x2), abcd}
}
