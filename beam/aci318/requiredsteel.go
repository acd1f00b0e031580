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

// RequiredSteel is the reinforcement that a factored moment needs in a section.
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
	// Equilibria is how many depths of the neutral axis balance the section with
	// this steel. With more than one, a check that takes the least of them finds
	// another strength.
	Equilibria int
}

// SteelQuery asks for the reinforcement of a section for one sense of bending.
// Depths are measured from the compression face.
type SteelQuery struct {
	Section  beam.Section // with the width of its flange given
	Bending  beam.Sense   // zero: positive
	Depth    units.Length // to the centroid of the tension steel, d
	Extreme  units.Length // to the extreme layer, dt; zero: as Depth
	Top      units.Length // to the compression steel, d'; zero: none may be used
	Strength units.Stress
	Yield    units.Stress
	Moment   units.Moment // factored, positive in the sense of bending
	Readings beam.Readings
}

// RequiredSteel gives the reinforcement that a factored moment needs: tension
// steel alone where that can do, by the stress block of 22.2 in the section as it
// is; else tension and compression steel, with the section just
// tension-controlled. The result is put back into the kernel that judges beams,
// which must find the moment again. Least steel (9.6.1) is another matter. The
// error says which value cannot be used, or that no reinforcement carries the
// moment.
func (c Code) RequiredSteel(q SteelQuery) (RequiredSteel, error) {
	e := c.e
	if q.Extreme.IsZero() {
		q.Extreme = q.Depth
	}
	if q.Bending == 0 {
		q.Bending = beam.Positive
	}
	if q.Section.Shape == 0 {
		q.Section.Shape = beam.Rectangular
	}
	geometry, faults := beam.MeasureSection(e.system, &q.Section)
	if len(faults) > 0 {
		return RequiredSteel{}, &beam.InputError{Faults: faults}
	}
	if err := q.check(e); err != nil {
		return RequiredSteel{}, err
	}
	z := e.sizing(geometry.Parts, q.Bending, q.Strength, q.Yield, q.Depth, q.Extreme, q.Readings.RoundedYield)
	moment := e.momentIn(q.Moment)
	var out RequiredSteel
	if s := z.tension(moment); s.ok {
		out = RequiredSteel{Tension: e.areaOf(s.area), NeutralAxis: e.lengthOf(s.axis), Strain: s.strain, Phi: s.phi}
	} else {
		if q.Top.IsZero() {
			return RequiredSteel{}, fmt.Errorf("aci318: no tension steel alone carries %s in this section: it needs more depth or width, or compression steel", e.moment.Format(q.Moment))
		}
		b := z.both(moment, e.lengthIn(q.Top), e.materials.steelModulus, q.Readings.IgnoreDisplaced)
		if !b.ok {
			return RequiredSteel{}, fmt.Errorf("aci318: compression steel %s below the compression face does not help: the neutral axis is at %s",
				e.length.Format(q.Top), e.length.Format(e.lengthOf(b.axis)))
		}
		out = RequiredSteel{
			Tension: e.areaOf(b.tension), Compression: e.areaOf(b.pressure), NeutralAxis: e.lengthOf(b.axis),
			Strain: z.strainAt(b.axis), Phi: b.phi, CompressionStress: e.stressOf(b.stress), CompressionYields: b.yields,
		}
	}
	if err := e.putBack(&q, geometry.Parts, &out); err != nil {
		return RequiredSteel{}, err
	}
	return out, nil
}

// putBackTolerance is the relative difference that the moment may show when the
// steel is put back: rounding.
const putBackTolerance = 1e-9

// putBack holds the steel against the kernel.
func (e *edition) putBack(q *SteelQuery, parts []mechanics.Part, r *RequiredSteel) error {
	section := mechanics.Section{Parts: parts}
	add := func(depth units.Length, area units.Area) {
		if q.Bending == beam.Negative {
			depth = section.Depth().Sub(depth)
		}
		section.Layers = append(section.Layers, mechanics.Layer{Depth: depth, Area: area, Steel: e.barSteel(q.Yield)})
	}
	add(q.Depth, r.Tension)
	if !r.Compression.IsZero() {
		add(q.Top, r.Compression)
	}
	law, err := e.block(q.Strength)
	if err != nil {
		return err
	}
	u, err := section.Ultimate(law, bendingOf(q.Bending, &q.Readings))
	if err != nil {
		return err
	}
	r.Equilibria = u.Equilibria
	found := u.Nominal.Scale(r.Phi)
	switch {
	case u.Equilibria > 1 && u.NeutralAxis.Less(r.NeutralAxis):
		return nil // the depth put in is one of the others
	case u.Layers[0].Stress.Neg().Less(q.Yield):
		return fmt.Errorf("aci318: tension steel whose centroid is %s from the compression face does not yield, with the extreme layer at %s and the neutral axis at %s: the layers lie too far apart",
			e.length.Format(q.Depth), e.length.Format(q.Extreme), e.length.Format(r.NeutralAxis))
	case found.Sub(q.Moment).Abs().Ratio(q.Moment) > putBackTolerance:
		return &DisagreementError{Nominal: q.Moment.Scale(1 / r.Phi), Other: u.Nominal}
	}
	return nil
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
		{"depth of the tension steel", q.Depth.Amount()},
		{"moment", q.Moment.Amount()}, {"concrete strength", q.Strength.Amount()}, {"yield strength", q.Yield.Amount()},
	} {
		if err := positive(v.name, v.value); err != nil {
			return err
		}
	}
	if q.Bending > beam.Negative {
		return fmt.Errorf("aci318: sense of bending is not known; allowed: positive, negative")
	}
	if !q.Depth.AtMost(q.Extreme) {
		return fmt.Errorf("aci318: depth of the extreme layer is %s; allowed: at least that of the centroid, %s", e.length.Format(q.Extreme), e.length.Format(q.Depth))
	}
	if !q.Extreme.AtMost(q.Section.Depth) {
		return fmt.Errorf("aci318: depth of the extreme layer is %s; allowed: no more than that of the section, %s", e.length.Format(q.Extreme), e.length.Format(q.Section.Depth))
	}
	if q.Top.Compare(units.Length{}) < 0 || !q.Top.Less(q.Depth) {
		return fmt.Errorf("aci318: depth of the compression steel is %s; allowed: from zero to less than that of the tension steel, %s", e.length.Format(q.Top), e.length.Format(q.Depth))
	}
	for _, r := range e.materialRefusals(&beam.Concrete{Strength: q.Strength}, q.Yield) {
		return fmt.Errorf("aci318: %s (%s)", r.Detail, r.Clause)
	}
	return nil
}
