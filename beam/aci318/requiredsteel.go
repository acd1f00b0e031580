package aci318

import (
	"fmt"
	"math"

	"soffit.example/beam"
	"soffit.example/units"
)

// requiredTension is the tension steel that a moment needs in a rectangle
// without compression steel, in every step and in the units of the edition.
// All of the steel is taken to yield, which the strain limit of 9.3.3.1
// ensures for the extreme layer.
type requiredTension struct {
	block, axis float64 // a and c
	strain      float64 // εt
	phi         float64
	area        float64
	ok          bool // false: no amount of tension steel alone would do
}

// rectangle is what required steel depends on, in the units of the edition.
type rectangle struct {
	fc, fy, beta1 float64
	width, depth  float64 // b and d
	extreme       float64 // dt
	yieldStrain   float64
	reduction     *reductionRules
}

func (e *edition) rectangle(strength, yield units.Stress, width, depth, extreme units.Length, rounded bool) rectangle {
	return rectangle{
		fc: e.stressIn(strength), fy: e.stressIn(yield), beta1: e.blockFactor(strength),
		width: e.lengthIn(width), depth: e.lengthIn(depth), extreme: e.lengthIn(extreme),
		yieldStrain: e.yieldStrain(yield, rounded), reduction: &e.reduction,
	}
}

// intensity is the force of the block over its depth.
func (r *rectangle) intensity() float64 { return blockIntensity * r.fc * r.width }

// axisAt is the depth of the neutral axis at which the extreme layer has a
// strain.
func (r *rectangle) axisAt(strain float64) float64 {
	return r.extreme * crushing / (crushing + strain)
}

func (r *rectangle) strainAt(axis float64) float64 {
	return crushing * (r.extreme - axis) / axis
}

// nominal is Mn with the neutral axis at a depth.
func (r *rectangle) nominal(axis float64) float64 {
	a := r.beta1 * axis
	return r.intensity() * a * (r.depth - a/2)
}

// design is φMn with the neutral axis at a depth.
func (r *rectangle) design(axis float64) float64 {
	phi, _ := r.reduction.flexure(r.strainAt(axis), r.yieldStrain)
	return phi * r.nominal(axis)
}

// axisFor is the neutral axis that gives a nominal moment; NaN where none
// does: 0.85 f'c b a (d - a/2) = Mn.
func (r *rectangle) axisFor(nominal float64) float64 {
	q := nominal / (r.intensity() * r.depth * r.depth)
	// The lesser root, in the form that does not subtract like numbers.
	return 2 * q * r.depth / (1 + math.Sqrt(1-2*q)) / r.beta1
}

// tension is the least tension steel for a factored moment.
func (r *rectangle) tension(moment float64) requiredTension {
	full, limit := r.axisAt(r.reduction.tensionStrain(r.yieldStrain)), r.axisAt(r.reduction.leastStrain(r.yieldStrain))
	axis := r.axisFor(moment / r.reduction.tension)
	if !(units.AtMost(axis, full)) { // also where no axis gives the moment
		if axis = r.axisBetween(full, limit, moment); math.IsNaN(axis) {
			return requiredTension{}
		}
	}
	strain := r.strainAt(axis)
	phi, _ := r.reduction.flexure(strain, r.yieldStrain)
	a := r.beta1 * axis
	return requiredTension{block: a, axis: axis, strain: strain, phi: phi, area: r.intensity() * a / r.fy, ok: true}
}

// axisBetween is the least depth of the neutral axis in the transition, from
// full to limit, that gives a factored moment; NaN where none does. φ falls
// there as Mn grows, and their product may rise or fall.
func (r *rectangle) axisBetween(full, limit, moment float64) float64 {
	const steps = 64
	low := full
	for i := 1; i <= steps; i++ {
		high := full + (limit-full)*float64(i)/steps
		if r.design(high) < moment && !units.AtMost(moment, r.design(high)) {
			low = high
			continue
		}
		for range 60 {
			mid := (low + high) / 2
			if r.design(mid) < moment {
				low = mid
			} else {
				high = mid
			}
		}
		return high
	}
	return math.NaN()
}

// requiredBoth is the steel of a doubly reinforced rectangle for a moment that
// tension steel alone cannot carry.
type requiredBoth struct {
	axis, block       float64
	phi               float64
	alone, rest       float64 // nominal moment of the concrete, and what compression steel adds
	stress            float64 // f's
	yields            bool
	tension, pressure float64 // As and A's
	ok                bool
}

// both puts the neutral axis where the section is just tension-controlled and
// leaves the rest of the moment to a couple of steel: tension steel against
// compression steel at depth top. With ignore, the concrete that compression
// steel displaces is not deducted.
func (r *rectangle) both(moment, top float64, steelModulus float64, ignore bool) requiredBoth {
	strain := math.Max(r.reduction.tensionStrain(r.yieldStrain), r.reduction.leastStrain(r.yieldStrain))
	b := requiredBoth{axis: r.axisAt(strain), phi: r.reduction.tension}
	b.block = r.beta1 * b.axis
	b.alone = r.nominal(b.axis)
	b.rest = moment/b.phi - b.alone
	free := steelModulus * crushing * (b.axis - top) / b.axis
	b.yields = units.AtMost(r.fy, free)
	b.stress = math.Min(r.fy, free)
	net := b.stress
	if top <= b.block && !ignore {
		net -= blockIntensity * r.fc
	}
	if net <= 0 || b.rest <= 0 {
		return b // compression steel that deep does not help, or is not needed
	}
	b.pressure = b.rest / (net * (r.depth - top))
	b.tension = (r.intensity()*b.block + b.pressure*net) / r.fy
	b.ok = true
	return b
}

// RequiredSteel is the reinforcement that a factored moment needs in a
// rectangle.
type RequiredSteel struct {
	Tension     units.Area
	Compression units.Area   // zero: none needed
	NeutralAxis units.Length // from the compression face
	Strain      float64      // of the extreme tension layer, tension positive
	Phi         float64
	// CompressionStress is the stress of the compression steel, and
	// CompressionYields whether that is its yield strength.
	CompressionStress units.Stress
	CompressionYields bool
}

// SteelQuery asks for the reinforcement of a rectangle.
type SteelQuery struct {
	Width    units.Length
	Depth    units.Length // to the centroid of the tension steel, d
	Extreme  units.Length // to the extreme layer, dt; zero: as Depth
	Top      units.Length // to the compression steel, d'; zero: none may be used
	Strength units.Stress
	Yield    units.Stress
	Moment   units.Moment // factored, positive
	Readings beam.Readings
}

// RequiredSteel gives the reinforcement that a factored moment needs: tension
// steel alone where that can do, by the closed form of the rectangular block
// (22.2); else tension and compression steel, with the section just
// tension-controlled. Least steel (9.6.1) is another matter. The error says
// which value cannot be used, or that no reinforcement carries the moment.
func (c Code) RequiredSteel(q SteelQuery) (RequiredSteel, error) {
	e := c.e
	if q.Extreme.IsZero() {
		q.Extreme = q.Depth
	}
	if err := q.check(e); err != nil {
		return RequiredSteel{}, err
	}
	r := e.rectangle(q.Strength, q.Yield, q.Width, q.Depth, q.Extreme, q.Readings.RoundedYield)
	moment := e.momentIn(q.Moment)
	if s := r.tension(moment); s.ok {
		return RequiredSteel{
			Tension: e.areaOf(s.area), NeutralAxis: e.lengthOf(s.axis), Strain: s.strain, Phi: s.phi,
		}, nil
	}
	if q.Top.IsZero() {
		return RequiredSteel{}, fmt.Errorf("aci318: no tension steel alone carries %s in this section: it needs more depth or width, or compression steel", e.moment.Format(q.Moment))
	}
	b := r.both(moment, e.lengthIn(q.Top), e.materials.steelModulus, q.Readings.IgnoreDisplaced)
	if !b.ok {
		return RequiredSteel{}, fmt.Errorf("aci318: compression steel %s below the compression face does not help: the neutral axis is at %s",
			e.length.Format(q.Top), e.length.Format(e.lengthOf(b.axis)))
	}
	return RequiredSteel{
		Tension: e.areaOf(b.tension), Compression: e.areaOf(b.pressure), NeutralAxis: e.lengthOf(b.axis),
		Strain: r.strainAt(b.axis), Phi: b.phi, CompressionStress: e.stressOf(b.stress), CompressionYields: b.yields,
	}, nil
}

// check names the first value that cannot be used.
func (q *SteelQuery) check(e *edition) error {
	positive := func(name string, v units.Amount) error {
		if !(v.SI() > 0) || !v.IsFinite() {
			return fmt.Errorf("aci318: %s is %s; allowed: above zero", name, e.system.Format(v))
		}
		return nil
	}
	for _, v := range []struct {
		name  string
		value units.Amount
	}{
		{"width", q.Width.Amount()}, {"depth of the tension steel", q.Depth.Amount()},
		{"moment", q.Moment.Amount()}, {"concrete strength", q.Strength.Amount()}, {"yield strength", q.Yield.Amount()},
	} {
		if err := positive(v.name, v.value); err != nil {
			return err
		}
	}
	if !q.Depth.AtMost(q.Extreme) {
		return fmt.Errorf("aci318: depth of the extreme layer is %s; allowed: at least that of the centroid, %s", e.length.Format(q.Extreme), e.length.Format(q.Depth))
	}
	if q.Top.Compare(units.Length{}) < 0 || !q.Top.Less(q.Depth) {
		return fmt.Errorf("aci318: depth of the compression steel is %s; allowed: from zero to less than that of the tension steel, %s", e.length.Format(q.Top), e.length.Format(q.Depth))
	}
	for _, r := range e.materialRefusals(&beam.Concrete{Strength: q.Strength}, q.Yield) {
		return fmt.Errorf("aci318: %s (%s)", r.Detail, r.Clause)
	}
	return nil
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
	r := e.rectangle(b.Concrete.Strength, b.Reinforcement.Yield, b.Section.Width, depth, depth, b.Readings.RoundedYield)
	if !r.mayCarry(mu) {
		return units.Area{}, false
	}
	perDepth := e.minimumSteel(b.Concrete.Strength, b.Reinforcement.Yield, b.Section.Width, depth).area / r.depth
	// A shade less, so that rounding never makes the bound miss steel that just
	// passes.
	return e.areaOf(r.leastArea(mu, perDepth, e.minimum.waiver) * (1 - 2e-9)), true
}

// mayCarry reports whether some amount of tension steel could carry a factored
// moment: false only if none does.
func (r *rectangle) mayCarry(moment float64) bool {
	limit := r.axisAt(r.reduction.leastStrain(r.yieldStrain))
	return units.AtMost(moment, r.reduction.tension*r.nominal(limit))
}

// strengthArea is a lower bound of the steel for a factored moment with its
// centroid at depth d: φ is at most that of a tension-controlled section and
// no bar is beyond its yield strength. NaN where no axis gives the moment.
func (r *rectangle) strengthArea(moment, d float64) float64 {
	at := *r
	at.depth = d
	return at.intensity() * at.beta1 * at.axisFor(moment/r.reduction.tension) / r.fy
}

// leastArea is the bound of leastTension.
func (r *rectangle) leastArea(moment, perDepth, waiver float64) float64 {
	strength, least := r.strengthArea(moment, r.depth), perDepth*r.depth
	if !(strength < least) {
		return strength
	}
	bound := math.Min(least, waiver*strength)
	// Where less depth makes the steel for strength equal the least steel,
	// both are smaller than the least steel at full depth.
	low, high := 0.0, r.depth
	for range 60 {
		mid := (low + high) / 2
		if r.strengthArea(moment, mid) < perDepth*mid {
			high = mid
		} else {
			low = mid // also where no axis gives the moment there
		}
	}
	return math.Min(bound, perDepth*low)
}
