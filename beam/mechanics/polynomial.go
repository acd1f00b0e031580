package mechanics

import "math"

// maxDegree bounds the polynomials of this package: a cubic law gives a balance
// of the fourth degree for rectangles and of the fifth for trapezoids.
const maxDegree = 5

// A polynomial holds its coefficients from the constant term up.
type polynomial [maxDegree + 1]float64

// at returns the value of p at x.
func (p *polynomial) at(x float64) float64 {
	return p[0] + x*(p[1]+x*(p[2]+x*(p[3]+x*(p[4]+x*p[5]))))
}

// slope returns the first derivative of p at x.
func (p *polynomial) slope(x float64) float64 {
	return p[1] + x*(2*p[2]+x*(3*p[3]+x*(4*p[4]+x*5*p[5])))
}

// magnitude returns the sum of the sizes of the terms of p at x, the scale
// against which rounding in at(x) is judged.
func (p *polynomial) magnitude(x float64) float64 {
	x = math.Abs(x)
	return math.Abs(p[0]) + x*(math.Abs(p[1])+x*(math.Abs(p[2])+x*(math.Abs(p[3])+x*(math.Abs(p[4])+x*math.Abs(p[5])))))
}

// addComposed adds weight·k^power·q(a - x·k), a polynomial in k, to p. The degree
// of q is given, so that short ones stay cheap; degree+power is at most maxDegree.
func (p *polynomial) addComposed(q *polynomial, degree int, a, x, weight float64, power int) {
	switch degree {
	case 0:
		p[power] += weight * q[0]
		return
	case 1:
		p[power] += weight * (q[0] + q[1]*a)
		p[power+1] -= weight * q[1] * x
		return
	}
	var r polynomial
	r[0] = q[degree]
	for j := degree - 1; j >= 0; j-- {
		for i := degree - j; i > 0; i-- {
			r[i] = r[i]*a - r[i-1]*x
		}
		r[0] = r[0]*a + q[j]
	}
	for i := 0; i <= degree; i++ {
		p[power+i] += weight * r[i]
	}
}

// divide takes the variable out of p once, its constant term being zero but for
// rounding.
func (p *polynomial) divide() { *p = polynomial{p[1], p[2], p[3], p[4], p[5]} }

// rootBound returns a positive number above every positive root of p, or 0 where
// p has no positive root at all (Cauchy's bound).
func (p *polynomial) rootBound() float64 {
	lead := maxDegree
	for lead > 0 && p[lead] == 0 {
		lead--
	}
	if lead == 0 {
		return 0
	}
	var most float64
	for _, c := range p[:lead] {
		most = math.Max(most, math.Abs(c))
	}
	return 1 + most/math.Abs(p[lead])
}

// bernstein returns the coefficients of p in the Bernstein basis of the given
// degree over [lo, hi]. The first is p(lo) and the last p(hi). The number of
// their sign changes is the number of roots inside, or more by an even number.
func (p *polynomial) bernstein(degree int, lo, hi float64) polynomial {
	w := hi - lo
	if degree <= 2 {
		q0 := p[0] + lo*(p[1]+lo*p[2])
		q1 := w * (p[1] + 2*lo*p[2])
		return polynomial{q0, q0 + q1/2, q0 + q1 + w*w*p[2]}
	}
	q0 := p.at(lo)
	q1 := w * p.slope(lo)
	q2 := w * w * (p[2] + lo*(3*p[3]+lo*(6*p[4]+lo*10*p[5])))
	q3 := w * w * w * (p[3] + lo*(4*p[4]+lo*10*p[5]))
	if degree == 3 {
		return polynomial{q0, q0 + q1/3, q0 + 2*q1/3 + q2/3, q0 + q1 + q2 + q3}
	}
	q4 := w * w * w * w * (p[4] + lo*5*p[5])
	if degree == 5 {
		q5 := w * w * w * w * w * p[5]
		return polynomial{
			q0,
			q0 + q1/5,
			q0 + 2*q1/5 + q2/10,
			q0 + 3*q1/5 + 3*q2/10 + q3/10,
			q0 + 4*q1/5 + 3*q2/5 + 2*q3/5 + q4/5,
			q0 + q1 + q2 + q3 + q4 + q5,
		}
	}
	return polynomial{
		q0,
		q0 + q1/4,
		q0 + q1/2 + q2/6,
		q0 + 3*q1/4 + q2/2 + q3/4,
		q0 + q1 + q2 + q3 + q4,
	}
}

// signChanges counts the changes of sign along the first degree+1 coefficients,
// zeros left out.
func (p *polynomial) signChanges(degree int) int {
	n, negative, known := 0, false, false
	for _, c := range p[:degree+1] {
		if c == 0 {
			continue
		}
		if known && negative != (c < 0) {
			n++
		}
		negative, known = c < 0, true
	}
	return n
}

// halves splits Bernstein coefficients at the middle of their interval (de
// Casteljau's construction).
func (p *polynomial) halves(degree int) (lower, upper polynomial) {
	b := *p
	for i := 0; i <= degree; i++ {
		lower[i] = b[0]
		upper[degree-i] = b[degree-i]
		for j := 0; j < degree-i; j++ {
			b[j] = (b[j] + b[j+1]) / 2
		}
	}
	return lower, upper
}

// appendRoots appends the roots of p strictly inside (lo, hi), the greatest
// first. b are the Bernstein coefficients of p over that interval. A pair of
// roots closer than about 1e-12 of their size counts as one.
func (p *polynomial) appendRoots(roots []float64, b *polynomial, degree int, lo, hi float64) []float64 {
	switch changes := b.signChanges(degree); {
	case changes == 0:
		return roots
	case changes == 1:
		return append(roots, p.refine(lo, hi, b, degree))
	case hi-lo <= 1e-12*hi:
		// Two roots that float64 cannot tell apart, or a near miss: the
		// curve touches zero if its value is lost in rounding.
		mid := lo + (hi-lo)/2
		if math.Abs(p.at(mid)) <= 1e-14*p.magnitude(mid) {
			roots = append(roots, mid)
		}
		return roots
	}
	mid := lo + (hi-lo)/2
	lower, upper := b.halves(degree)
	roots = p.appendRoots(roots, &upper, degree, mid, hi)
	if upper[0] == 0 {
		roots = append(roots, mid)
	}
	return p.appendRoots(roots, &lower, degree, lo, mid)
}

// refine returns the one root of p in [lo, hi], by the formula where p is a
// quadratic whose ends differ in sign, otherwise by Newton's method.
func (p *polynomial) refine(lo, hi float64, b *polynomial, degree int) float64 {
	if degree == 2 {
		if x, ok := p.quadraticRoot(lo, hi); ok {
			return x
		}
	}
	last := degree
	for b[last] == 0 { // there are two that differ in sign
		last--
	}
	x, _ := p.newton(lo, hi, firstGuess(b, degree, lo, hi), b[last] > 0)
	return x
}

// quadraticRoot returns the root in [lo, hi] of a quadratic or a line whose roots
// do not have the same sign: the discriminant is then a sum of positive terms, and
// so is the denominator or numerator chosen, so that nothing cancels.
func (p *polynomial) quadraticRoot(lo, hi float64) (x float64, ok bool) {
	if p[0]*p[2] > 0 {
		return 0, false
	}
	q := -(p[1] + math.Copysign(math.Sqrt(p[1]*p[1]-4*p[0]*p[2]), p[1])) / 2
	if x := p[0] / q; x >= lo && x <= hi {
		return x, true
	}
	x = q / p[2]
	return x, x >= lo && x <= hi
}

// firstGuess returns where the chord between the ends passes through zero, unless
// that is next to an end, which may be another root but for its last bits: then,
// and where there is no such place, the middle.
func firstGuess(b *polynomial, degree int, lo, hi float64) float64 {
	edge := (hi - lo) / 1024
	if x := lo - b[0]*(hi-lo)/(b[degree]-b[0]); x > lo+edge && x < hi-edge {
		return x
	}
	return lo + (hi-lo)/2
}

// newton returns the root of p in [lo, hi], which p rises or falls through, and in
// how many steps from x it was found. Newton's method is kept inside a shrinking
// bracket: a step that leaves the bracket, or gains too little, is replaced by
// halving it.
func (p *polynomial) newton(lo, hi, x float64, rising bool) (root float64, steps int) {
	before := hi - lo
	for steps < 200 {
		f := p.at(x)
		switch {
		case f == 0:
			return x, steps
		case (f > 0) == rising:
			hi = x
		default:
			lo = x
		}
		steps++
		step := -f / p.slope(x)
		next := x + step
		if !(next > lo && next < hi) || math.Abs(step) > before/2 {
			next = lo + (hi-lo)/2
			step = next - x
		}
		if math.Abs(step) <= 0x1p-52*x {
			return next, steps
		}
		before = math.Abs(step)
		x = next
	}
	return x, steps
}
