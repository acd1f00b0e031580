package aci318

import "math"

// shearStretch is the shear and moment of one combination along a stretch on
// which no load begins or ends: V = v[0] + v[1] t + v[2] t2, and M its
// integral from m. It is found exactly from the forces at both ends, in SI
// units.
type shearStretch struct {
	length float64
	m      float64
	v      [3]float64
	end    float64 // V at the end, as given
	scale  float64 // the greatest moment, or shear times length, of the ends
}

// newShearStretch fits the stretch to its end forces.
func newShearStretch(length, m0, v0, m1, v1 float64) shearStretch {
	mean := (m1 - m0) / length
	return shearStretch{
		length: length, m: m0, end: v1,
		v:     [3]float64{v0, 2 * (3*mean - 2*v0 - v1) / length, 3 * (v0 + v1 - 2*mean) / (length * length)},
		scale: max(math.Abs(m0), math.Abs(m1), math.Abs(v0)*length, math.Abs(v1)*length),
	}
}

func (p *shearStretch) shear(t float64) float64 {
	if t >= p.length { // without the rounding of a very short stretch
		return p.end
	}
	return p.v[0] + t*(p.v[1]+t*p.v[2])
}

func (p *shearStretch) moment(t float64) float64 {
	return p.m + t*(p.v[0]+t*(p.v[1]/2+t*p.v[2]/3))
}

// curved reports whether the shear is more than linear along the stretch.
func (p *shearStretch) curved() bool {
	return math.Abs(p.v[2])*p.length*p.length > noBending*(math.Abs(p.v[0])+math.Abs(p.end))
}

// vertex is where the shear is extreme between a and b; ok is false if it is
// so only at an end.
func (p *shearStretch) vertex(a, b float64) (t float64, ok bool) {
	if p.v[2] == 0 {
		return 0, false
	}
	t = -p.v[1] / (2 * p.v[2])
	return t, a < t && t < b
}

// turns are the places inside the stretch, in order, where the shear vanishes
// and the moment is extreme.
func (p *shearStretch) turns() (t [2]float64, n int) {
	a, b, c := p.v[2], p.v[1], p.v[0]
	var roots [2]float64
	k := 0
	if disc := b*b - 4*a*c; disc >= 0 {
		// Without cancellation, the lesser in magnitude first; a zero
		// denominator gives a root off the stretch, which is dropped below.
		q := -(b + math.Copysign(math.Sqrt(disc), b)) / 2
		if q != 0 {
			roots[k] = c / q
			k++
		}
		if a != 0 {
			roots[k] = q / a
			k++
		}
	}
	for _, r := range roots[:k] {
		if 0 < r && r < p.length {
			t[n] = r
			n++
		}
	}
	return t, n
}

// noBending is the share of a stretch's scale below which a moment has no sign:
// it is what rounding leaves.
const noBending = 1e-9

// bends is the sign of the moment at t: 1, -1, or 0 where it vanishes.
func (p *shearStretch) bends(t float64) int {
	m := p.moment(t)
	switch {
	case m > noBending*p.scale:
		return 1
	case m < -noBending*p.scale:
		return -1
	}
	return 0
}

// signedPart is a part of a stretch on which the moment keeps its sign.
type signedPart struct {
	from, to float64
	sign     int // 0: the moment vanishes on all of the stretch
}

// parts cuts the stretch where the moment changes its sign.
func (p *shearStretch) parts() (parts [4]signedPart, n int) {
	turns, k := p.turns()
	places := [4]float64{0}
	copy(places[1:], turns[:k])
	places[k+1] = p.length
	current := signedPart{}
	last := 0.0 // the last place with a sign
	for _, t := range places[:k+2] {
		sign := p.bends(t)
		if sign == 0 {
			continue
		}
		if current.sign == 0 {
			current.sign = sign
		} else if sign != current.sign {
			current.to = p.crossing(last, t)
			parts[n] = current
			n++
			current = signedPart{from: current.to, sign: sign}
		}
		last = t
	}
	current.to = p.length
	parts[n] = current
	return parts, n + 1
}

// crossing is the place between a and b where the moment vanishes; it has
// opposite signs there and is monotone between them.
func (p *shearStretch) crossing(a, b float64) float64 {
	up := p.moment(a) < 0
	for range 60 {
		mid := (a + b) / 2
		if (p.moment(mid) < 0) == up {
			a = mid
		} else {
			b = mid
		}
	}
	return (a + b) / 2
}
