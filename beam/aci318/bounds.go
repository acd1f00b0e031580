package aci318

import (
	"math"

	"soffit.example/beam"
	"soffit.example/units"
)

// WidestSpacing is the greatest spacing of stirrups along a beam that Table
// 9.7.6.2.2 permits at an effective depth, where the required Vs is small.
func (c Code) WidestSpacing(_ *beam.Problem, depth units.Length) units.Length {
	e := c.e
	return depth.Scale(alongShare).Min(e.lengthOf(e.stirrups.most))
}

// leastTension is a lower bound of the tension steel of a sense: see
// beam.Code. It counts the least steel of 9.6.1 too.
//
// With bars no further from the compression face than depth, the centroid and
// the extreme layer are no further either. The steel required for strength
// falls as the centroid goes down, and the least steel of 9.6.1.2 grows, so
// that the bound is the least over all centroids of
// max(As,req, min(As,min, 4/3 As,req)).
func (e *edition) leastTension(p *beam.Problem, s beam.Sense, depth units.Length) (area units.Area, ok bool) {
	b := &p.Brief
	moment, bent := greatestMoment(p, s)
	if !bent {
		return units.Area{}, true
	}
	mu := e.momentIn(moment)
	if deep := !units.AtMost(e.lengthIn(b.Section.Depth), e.crack.deep); deep && b.Readings.CountSideBars && !p.Twisted {
		return units.Area{}, true // bars along the sides may carry a part of the moment
	}
	z := e.sizing(p.Geometry.Parts, s, b.Concrete.Strength, b.Reinforcement.Yield, depth, depth, b.Readings.RoundedYield)
	if !z.mayCarry(mu) {
		return units.Area{}, false
	}
	perDepth := e.minimumSteel(b.Concrete.Strength, b.Reinforcement.Yield, e.problemWidth(p, s), depth).area / z.depth
	// A shade less, so that rounding never makes the bound miss steel that just
	// passes.
	return e.areaOf(z.leastArea(mu, perDepth, e.minimum.waiver) * (1 - 2e-9)), true
}

// mayCarry reports whether some amount of tension steel could carry a factored
// moment: false only if none does.
func (z *sizing) mayCarry(moment float64) bool {
	limit := z.axisAt(z.reduction.leastStrain(z.yieldStrain))
	return units.AtMost(moment, z.reduction.tension*z.nominal(limit))
}

// strengthArea is a lower bound of the steel for a factored moment with its
// centroid at depth d: φ is at most that of a tension-controlled section and
// no bar is beyond its yield strength. NaN where no axis gives the moment.
func (z *sizing) strengthArea(moment, d float64) float64 {
	at := *z
	at.depth = d
	area, _ := at.concrete(at.beta1 * at.axisFor(moment/z.reduction.tension))
	return z.intensity() * area / z.fy
}

// leastArea is the bound of leastTension.
func (z *sizing) leastArea(moment, perDepth, waiver float64) float64 {
	strength, least := z.strengthArea(moment, z.depth), perDepth*z.depth
	if !(strength < least) {
		return strength
	}
	bound := math.Min(least, waiver*strength)
	// Where less depth makes the steel for strength equal the least steel,
	// both are smaller than the least steel at full depth.
	low, high := 0.0, z.depth
	for range 60 {
		mid := (low + high) / 2
		if z.strengthArea(moment, mid) < perDepth*mid {
			high = mid
		} else {
			low = mid // also where no axis gives the moment there
		}
	}
	return math.Min(bound, perDepth*low)
}
