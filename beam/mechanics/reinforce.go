package mechanics

import "soffit.example/units"

// RequiredTension returns the least area of one layer of tension steel, at the
// depth and of the steel that tension gives, with which a stack of parts and no
// other steel has a nominal moment. It is zero where the axial force alone gives
// the moment. The area that tension gives is disregarded; so is
// bending.Displaced, since that steel displaces no concrete under stress.
//
// The moment of the concrete about the steel fixes the neutral axis, and the
// balance of forces the area. Where the stressed concrete lies within one
// rectangle at the compression face the neutral axis is the root of a quadratic,
// as for the function [RequiredTension]; elsewhere it is halved down to the last
// bits from the first of 32 depths with moment enough. That is the least where the
// moment rises with the depth, as it does unless the law softens.
//
// Its errors are [*InputError], in which the layer is layers[0], and where no
// area gives the moment [*UnreachableError].
func (s *Solver) RequiredTension(parts []Part, law Law, bending Bending, tension Layer, moment units.Moment) (units.Area, error) {
	m, err := target(moment)
	if err != nil {
		return units.Area{}, err
	}
	tension.Area = units.SquareMetre.Of(1)
	s.layers = append(s.layers[:0], tension)
	if err := s.load(Section{Parts: parts, Layers: s.layers}, law, bending); err != nil {
		return units.Area{}, err
	}
	if err := s.checkTension(m, bending, tension.Depth); err != nil {
		return units.Area{}, err
	}
	k, ok := s.axisForMoment(m, 1)
	if !ok {
		return units.Area{}, s.unreachable(moment, k)
	}
	force, _ := s.aboutSteel(k)
	area := s.tensionArea(k, force)
	if !(area <= mostArea) { // next to the neutral axis steel has no stress
		return units.Area{}, s.unreachable(moment, k)
	}
	return units.SquareMetre.Of(area), nil
}

// RequiredBoth returns the areas of one layer of tension steel and one of
// compression steel, at the depths and of the steels given, with which a stack of
// parts and no other steel has a nominal moment while the tension steel is
// strained by at least strain: the least compression steel, zero where tension
// steel alone can do it, and the tension steel that goes with it. The areas
// that the layers give are disregarded.
//
// With compression steel the neutral axis is where the tension steel has just
// that strain. Deducting displaced concrete can give the section another
// equilibrium of less depth, which [Solver.Ultimate] then reports first: the one
// sized for is among the others.
//
// Its errors are [*InputError], in which tension is layers[0] and compression
// layers[1], and [*UnreachableError] where the compression steel lies too deep to
// help.
func (s *Solver) RequiredBoth(parts []Part, law Law, bending Bending, tension, compression Layer, strain float64, moment units.Moment) (tensionArea, compressionArea units.Area, err error) {
	m, err := target(moment)
	if err == nil {
		err = checkNumber("strain", strain, 1e-6, 1)
	}
	if err != nil {
		return units.Area{}, units.Area{}, err
	}
	tension.Area = units.SquareMetre.Of(1)
	compression.Area = tension.Area
	s.layers = append(s.layers[:0], tension, compression)
	if err := s.load(Section{Parts: parts, Layers: s.layers}, law, bending); err != nil {
		return units.Area{}, units.Area{}, err
	}
	if err := s.checkTension(m, bending, tension.Depth); err != nil {
		return units.Area{}, units.Area{}, err
	}
	d, upper := s.bars[0].at, &s.bars[1]
	if upper.at >= d {
		return units.Area{}, units.Area{}, fault("layers", 1, "depth", compression.Depth, "nearer the compression face than the tension steel, at "+tension.Depth.String())
	}
	share := law.ultimate / (law.ultimate + strain) // of d, of the neutral axis
	limit := 1 / (share * d)
	most, mostMoment := s.aboutSteel(limit)
	short := s.axial*s.depth - most // force that the concrete cannot balance
	if k, ok := s.axisForMoment(m, share); ok && short <= 0 {
		force, _ := s.aboutSteel(k)
		return units.SquareMetre.Of(s.tensionArea(k, force)), units.Area{}, nil
	}
	above := 1 - limit*upper.at // strain of the compression steel
	stress := upper.elasticPlastic(above)
	if s.deduct {
		stress -= law.at(above)
	}
	added := max(short, (m+s.axialAboutSteel()-mostMoment)/((d-upper.at)*s.depth)) // force
	area := s.tensionArea(limit, most+added)
	if !(stress > 0 && added/stress <= mostArea && area <= mostArea) {
		return units.Area{}, units.Area{}, s.unreachable(moment, limit)
	}
	return units.SquareMetre.Of(area), units.SquareMetre.Of(added / stress), nil
}

// aboutSteel returns the force of the concrete at k, in N, and its moment about
// the first bar.
func (s *Solver) aboutSteel(k float64) (force, moment float64) {
	c := s.depth / k
	force, first, _ := s.concrete(k)
	return force * c, c * (force*s.bars[0].at*s.depth - first*c)
}

// axialAboutSteel returns the moment of the axial force, which acts at the
// centroid of the concrete, about the first bar.
func (s *Solver) axialAboutSteel() float64 {
	_, _, centroid := s.concrete(1)
	return s.axial * s.depth * (s.bars[0].at - centroid) * s.depth
}

// checkTension refuses tension steel at the compression face, and an axial force
// that with the moment leaves no compression: a tension between the centroid and
// the steel.
func (s *Solver) checkTension(moment float64, bending Bending, depth units.Length) error {
	switch {
	case s.bars[0].at == 0:
		return fault("layers", 0, "depth", depth, "away from the compression face")
	case !(moment+s.axialAboutSteel() > 0):
		return &InputError{Field: "axial", Value: bending.Axial.String(), Allowed: "a force with which the moment about the tension steel is above 0"}
	}
	return nil
}

// tensionArea returns the area of the first bar that balances a compression of
// the rest of the section, in N, at k; in m².
func (s *Solver) tensionArea(k, compression float64) float64 {
	b := &s.bars[0]
	pull := compression - s.axial*s.depth
	return max(0, pull/-b.elasticPlastic(1-k*b.at))
}

// elasticPlastic returns the stress in Pa at a strain over the ultimate strain.
func (b *bar) elasticPlastic(strain float64) float64 {
	return max(-b.yield, min(b.yield, b.elastic*strain))
}

// unreachable reports a moment that no steel gives the section, the greatest being
// with the neutral axis at k.
func (s *Solver) unreachable(moment units.Moment, k float64) error {
	_, most := s.aboutSteel(k)
	return &UnreachableError{Moment: moment, Greatest: units.NewtonMetre.Of(most - s.axialAboutSteel())}
}

// axisForMoment returns the greatest k at which the concrete, with the axial
// force, has a nominal moment in N-m with tension at the first bar, the neutral
// axis being no deeper than share of the depth of that bar. Where there is none
// it returns the k of the greatest moment.
func (s *Solver) axisForMoment(moment, share float64) (k float64, ok bool) {
	want := moment + s.axialAboutSteel()
	deepest := share * s.bars[0].at
	if k, ok := s.axisInRectangle(want); ok && k*deepest >= 1 {
		return k, true
	}
	const samples = 32
	var before, best, greatest float64
	for i := range samples {
		depth := deepest * float64(i+1) / samples
		_, m := s.aboutSteel(1 / depth)
		if m >= want {
			return s.refineAxis(want, before, depth), true
		}
		if m > greatest {
			best, greatest = depth, m
		}
		before = depth
	}
	return 1 / best, false
}

// axisInRectangle returns the k at which stressed concrete that all lies within
// one rectangle at the compression face has a moment about the first bar.
func (s *Solver) axisInRectangle(want float64) (k float64, ok bool) {
	if s.edges[0].slope != 0 {
		return 0, false
	}
	force, first := s.law.resultant()
	c, ok := axisFor(force*s.edges[0].width, first/force, s.bars[0].at*s.depth, want)
	if !ok || !(c > 0) || c*(1-s.law.pieces[0].from) > s.edges[1].at*s.depth {
		return 0, false
	}
	return s.depth / c, true
}

// refineAxis halves the depths of the neutral axis between low, with too small a
// moment, and high.
func (s *Solver) refineAxis(want, low, high float64) (k float64) {
	for range 100 {
		mid := low + (high-low)/2
		if mid <= low || mid >= high {
			break
		}
		if _, m := s.aboutSteel(1 / mid); m < want {
			low = mid
		} else {
			high = mid
		}
	}
	return 1 / high
}
