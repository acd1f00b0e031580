package aci318

import (
	"math"

	"soffit.example/beam"
	"soffit.example/units"
)

// meetCurve meets the sections of a part of a curved stretch where shear and
// torque are extreme together. The torque runs along straight lines, which from
// one concentrated torque to the next are parallel. What an outer leg needs and
// the stress of a hollow section are sums of shear and torque; the stress of a
// solid section is the root of the sum of their squares.
func (z *webZone) meetCurve(sense beam.Sense, s *loadedStretch, p signedPart) {
	e, q, web := z.e, &z.torsion, &z.web[senseIndex(sense)]
	c := &q.cage
	if c.area == 0 || web.bare.web <= 0 {
		return
	}
	meet := func(t float64) { z.station(sense, s, t) }
	a, b := z.t.Forces.Action(s.i, z.span, s.from, true), z.t.Forces.Action(s.i, z.span, s.to, false)
	all := torqueEnds{e.momentIn(a.Torque), e.momentIn(b.Torque)}
	own := torqueEnds{e.momentIn(a.Torque.Sub(a.Compatible)), e.momentIn(b.Torque.Sub(b.Compatible))}
	newton := 1 / e.forceOf(1).In(units.Newton)
	leg := c.legFor(1) * web.phi * web.fyt * web.bare.d * q.legs / newton // shear whose need of a leg is that of a unit of torque
	stress := c.sideStress(1) * web.bare.web / newton                     // and whose stress
	for _, line := range [2]torqueEnds{all, own} {
		s.meetSums(leg, line, p, meet)
		if c.walls {
			s.meetSums(stress, line, p, meet)
		} else {
			s.meetRoots(stress, line, p, meet)
		}
	}
}

// meetSums meets the places of a part where V + f T or V - f T is stationary,
// for a torque T that is straight along the stretch.
func (s *shearStretch) meetSums(f float64, torque torqueEnds, p signedPart, meet func(t float64)) {
	rise := f * (torque.to - torque.from) / s.length
	for _, slope := range [2]float64{rise, -rise} {
		if t := (slope - s.v[1]) / (2 * s.v[2]); p.from < t && t < p.to {
			meet(t)
		}
	}
}

// meetRoots meets the places of a part where V² + (f T)² is stationary: the
// roots of half its derivative, a cubic, one of which at most lies between two
// of the places where that turns.
func (s *shearStretch) meetRoots(f float64, torque torqueEnds, p signedPart, meet func(t float64)) {
	v, start, rise := &s.v, f*torque.from, f*(torque.to-torque.from)/s.length
	c := [4]float64{v[0]*v[1] + start*rise, v[1]*v[1] + 2*v[0]*v[2] + rise*rise, 3 * v[1] * v[2], 2 * v[2] * v[2]}
	at := func(t float64) float64 { return c[0] + t*(c[1]+t*(c[2]+t*c[3])) }
	places := [4]float64{p.from, p.to, p.to, p.to}
	n := 1
	if d := c[2]*c[2] - 3*c[1]*c[3]; d > 0 {
		root := math.Sqrt(d)
		for _, t := range [2]float64{(-c[2] - root) / (3 * c[3]), (-c[2] + root) / (3 * c[3])} {
			if p.from < t && t < p.to {
				places[n] = t
				n++
			}
		}
	}
	for k := range n {
		a, b := places[k], places[k+1]
		up := at(a) < 0
		if up == (at(b) < 0) {
			continue
		}
		for range halvings {
			if mid := (a + b) / 2; (at(mid) < 0) == up {
				a = mid
			} else {
				b = mid
			}
		}
		meet((a + b) / 2)
	}
}
