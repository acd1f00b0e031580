package aci318

import (
	"fmt"
	"math"

	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// requiredBoth is the steel of a doubly reinforced section for a moment that
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
func (z *sizing) both(moment, top float64, steelModulus float64, ignore bool) requiredBoth {
	strain := math.Max(z.reduction.tensionStrain(z.yieldStrain), z.reduction.leastStrain(z.yieldStrain))
	b := requiredBoth{axis: z.axisAt(strain), phi: z.reduction.tension}
	b.block = z.beta1 * b.axis
	b.alone = z.nominal(b.axis)
	b.rest = moment/b.phi - b.alone
	free := steelModulus * crushing * (b.axis - top) / b.axis
	b.yields = units.AtMost(z.fy, free)
	b.stress = math.Min(z.fy, free)
	net := b.stress
	if top <= b.block && !ignore {
		net -= blockIntensity * z.fc
	}
	if net <= 0 || b.rest <= 0 {
		return b // compression steel that deep does not help, or is not needed
	}
	b.pressure = b.rest / (net * (z.depth - top))
	concrete, _ := z.concrete(b.block)
	b.tension = (z.intensity()*concrete + b.pressure*net) / z.fy
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
	r := e.sizing(mechanics.Rectangle(q.Width, q.Extreme), beam.Positive, q.Strength, q.Yield, q.Depth, q.Extreme, q.Readings.RoundedYield)
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
