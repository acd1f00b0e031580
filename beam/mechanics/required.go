package mechanics

import (
	"errors"
	"fmt"
	"math"

	"soffit.example/units"
)

// RequiredTension returns the area of tension steel at a depth from the
// compression face that gives a rectangle, without other steel or axial force, a
// nominal moment under a law. The neutral axis is the root of a quadratic, so
// for a block of factor β, intensity f and yielding steel the area is the
// textbook f·width·a/Yield with a = depth - √(depth² - 2·moment/(f·width)).
// Steel that does not yield counts with the stress that it reaches.
//
// Its errors are [*InputError] and, where no equilibrium gives the moment,
// [*UnreachableError].
func RequiredTension(width, depth units.Length, law Law, steel Steel, moment units.Moment) (units.Area, error) {
	trial := Section{
		Parts:  Rectangle(width, depth),
		Layers: []Layer{{Depth: depth, Area: units.SquareMetre.Of(1), Steel: steel}},
	}
	if err := errors.Join(law.check(), trial.Validate()); err != nil {
		return units.Area{}, err
	}
	m, err := target(moment)
	if err != nil {
		return units.Area{}, err
	}
	b, d := width.In(units.Metre), depth.In(units.Metre)
	force, first := law.resultant()
	c, ok := axisFor(force*b, first/force, d, m)
	if !ok || c >= d {
		// Steel at the depth of the neutral axis has no stress.
		return units.Area{}, &UnreachableError{Moment: moment, Greatest: units.NewtonMetre.Of(d * d * (force - first) * b)}
	}
	tension := steel.Stress(law.ultimate * (d - c) / c)
	return units.Newton.Of(force * b * c).DivStress(tension), nil
}

// axisFor returns the lesser root c of moment = force·c·(d - lever·c): the depth
// of the neutral axis at which concrete with a force in proportion to it, acting
// at lever times the depth, has the moment about steel at d.
func axisFor(force, lever, d, moment float64) (c float64, ok bool) {
	root := 1 - 4*lever*moment/(force*d*d)
	if root < 0 {
		return 0, false
	}
	return 2 * moment / (force * d * (1 + math.Sqrt(root))), true
}

// RequiredArea returns the least area of one layer of the section, the other
// layers as they are, that gives the section a nominal moment; zero where the
// section has it without that layer. What the section says of the layer's own
// area is disregarded. The strength is taken to grow with the area, as it does
// while the steel on the tension side yields; where a section has steel enough
// to stop that, the area is one that suffices, and perhaps not the least. Areas
// up to that of the concrete are tried.
//
// Its errors are [*InputError] and [*UnreachableError].
func (s *Solver) RequiredArea(section Section, layer int, law Law, bending Bending, moment units.Moment) (units.Area, error) {
	if layer < 0 || layer >= len(section.Layers) {
		return units.Area{}, &InputError{Field: "layer", Value: fmt.Sprint(layer), Allowed: fmt.Sprintf("an index into the %d layers of the section", len(section.Layers))}
	}
	if _, err := target(moment); err != nil {
		return units.Area{}, err
	}
	s.layers = append(s.layers[:0], section.Layers...)
	section.Layers = s.layers
	least := units.SquareMetre.Of(leastArea)
	gross, err := section.Gross()
	if err != nil {
		return units.Area{}, err
	}

	var greatest units.Moment
	enough := func(area units.Area) (bool, error) {
		section.Layers[layer].Area = area
		err := s.Ultimate(&s.trial, section, law, bending)
		if _, none := errors.AsType[*NoEquilibriumError](err); none {
			return false, nil
		}
		if err != nil {
			return false, err
		}
		greatest = greatest.Max(s.trial.Nominal)
		return !s.trial.Nominal.Less(moment), nil
	}
	if ok, err := enough(least); err != nil || ok {
		return units.Area{}, err
	}
	// Double from what the steel alone would need at the full depth.
	low, high := least, moment.DivLength(section.Depth()).DivStress(section.Layers[layer].Steel.Yield).Max(least)
	for {
		high = high.Min(gross.Area)
		ok, err := enough(high)
		if err != nil {
			return units.Area{}, err
		}
		if ok {
			break
		}
		if !high.Less(gross.Area) {
			return units.Area{}, &UnreachableError{Moment: moment, Greatest: greatest}
		}
		low, high = high, high.Scale(2)
	}
	for range 100 {
		mid := low.Add(high).Scale(0.5)
		if !low.Less(mid) || !mid.Less(high) {
			break
		}
		ok, err := enough(mid)
		if err != nil {
			return units.Area{}, err
		}
		if ok {
			high = mid
		} else {
			low = mid
		}
	}
	return high, nil
}

// target returns a moment in N-m, refusing one that no section is sized for.
func target(moment units.Moment) (float64, error) {
	m := moment.In(units.NewtonMetre)
	if !(m > 0 && m <= 1e18) {
		return 0, &InputError{Field: "moment", Value: moment.String(), Allowed: "above 0, at most 1e15 kN-m"}
	}
	return m, nil
}
