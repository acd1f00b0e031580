package mechanics

import (
	"math"
	"slices"

	"soffit.example/units"
)

// Bending says how a section is bent. The zero value is plain sagging: no axial
// force, and the concrete that bars displace is deducted.
type Bending struct {
	Sense     Sense
	Axial     units.Force // compression positive
	Displaced Displaced
}

// Displaced says what becomes of the concrete whose place a bar takes.
type Displaced uint8

const (
	// Deduct takes the law's stress at the bar's strain off the bar's own:
	// under a rectangular block, only where the bar lies inside the block.
	Deduct Displaced = iota
	// Ignore counts the concrete as if it were there beside the bar.
	Ignore
)

// Ultimate is the equilibrium of a section whose compression face is at the
// ultimate strain of the concrete. Depths are measured from that face; strains,
// stresses and forces are compression positive unless said otherwise.
type Ultimate struct {
	NeutralAxis      units.Length
	CompressionDepth units.Length    // of concrete under stress: the depth of a block; not beyond the section
	Curvature        units.Curvature // ultimate strain over NeutralAxis

	Concrete      units.Force  // of the concrete, as if no bar were in it
	ConcreteDepth units.Length // where that force acts

	Layers []LayerState // one a layer of the section, in its order

	// The layer farthest from the compression face, yielding or not. The
	// strain is positive in tension. Both are zero without steel.
	ExtremeDepth  units.Length
	ExtremeStrain float64

	// The layers strained in tension: their area and centroid. Both are zero
	// where there are none.
	TensionArea    units.Area
	EffectiveDepth units.Length

	// The layers farther than half the depth of the section from the
	// compression face, whatever their strain: the flexural tension side.
	TensionSideArea  units.Area
	TensionSideDepth units.Length

	// Moment about the centroid of the concrete section, positive in the sense
	// of bending; without axial force any point gives the same.
	Nominal units.Moment

	// Deducting displaced concrete makes the balance of forces drop where the
	// edge of a block passes a bar, and a law that softens makes it fall: more
	// than one depth can then balance. This equilibrium is the one of least
	// depth; the neutral axes of the others follow in increasing depth.
	Equilibria int
	Others     []units.Length

	Residual units.Force // compression less tension less axial force: rounding
}

// A LayerState is what a layer of steel does, compression positive.
type LayerState struct {
	Depth     units.Length // from the compression face
	Strain    float64
	Stress    units.Stress // of the steel
	Displaced units.Stress // of the concrete, as deducted
	Force     units.Force  // of the area, at Stress less Displaced
}

// Ultimate returns the equilibrium of the section under a law. It serves one
// call; a [Solver] serves many without allocating.
//
// Its errors are [*InputError] and [*NoEquilibriumError].
func (s Section) Ultimate(law Law, bending Bending) (Ultimate, error) {
	var solver Solver
	var u Ultimate
	err := solver.Ultimate(&u, s, law, bending)
	return u, err
}

// A Solver finds equilibria. Its zero value is ready; it keeps its working
// storage from call to call, so that it allocates nothing once it has seen a
// section of the same size. A Solver is for one goroutine at a time.
type Solver struct {
	law    Law
	depth  float64 // of the section, m
	axial  float64 // N over depth
	deduct bool
	power  int // of k in the balance: 1, or 2 where a part tapers

	edges  []edge
	bars   []bar
	events []event
	roots  []float64

	layers []Layer // for required areas
	trial  Ultimate
	pieces []piece // of a truncated law
}

// Ultimate finds the equilibrium of the section under the law and writes it to
// dst, whose slices it reuses. After an error dst holds no result.
//
// Its errors are [*InputError] and [*NoEquilibriumError].
func (s *Solver) Ultimate(dst *Ultimate, section Section, law Law, bending Bending) error {
	*dst = Ultimate{Layers: dst.Layers[:0], Others: dst.Others[:0]}
	if err := s.load(section, law, bending); err != nil {
		return err
	}
	s.solve(dst)
	if len(s.roots) == 0 {
		least, most := s.axialLimits()
		return &NoEquilibriumError{
			Sense: bending.Sense, Axial: bending.Axial,
			Least: units.Newton.Of(least), Most: units.Newton.Of(most),
		}
	}
	dst.Equilibria = len(s.roots)
	for _, k := range s.roots[1:] {
		dst.Others = append(dst.Others, units.Metre.Of(s.depth/k))
	}
	return nil
}

// load turns the typed section into numbers, measured from the compression face
// as fractions of the depth.
func (s *Solver) load(section Section, law Law, bending Bending) error {
	if err := law.check(); err != nil {
		return err
	}
	if err := section.Validate(); err != nil {
		return err
	}
	if err := bending.check(); err != nil {
		return err
	}
	s.law = law
	s.depth = section.Depth().In(units.Metre)
	s.axial = bending.Axial.In(units.Newton) / s.depth
	s.deduct = bending.Displaced == Deduct
	s.loadEdges(section.Parts, bending.Sense == Hogging)
	s.loadBars(section.Layers, bending.Sense == Hogging)
	s.listEvents()
	return nil
}

func (b Bending) check() error {
	switch {
	case b.Sense > Hogging:
		return &InputError{Field: "sense", Value: b.Sense.String(), Allowed: "Sagging or Hogging"}
	case b.Displaced > Ignore:
		return &InputError{Field: "displaced", Value: "unknown", Allowed: "Deduct or Ignore"}
	case !(math.Abs(b.Axial.In(units.Newton)) <= 1e15):
		return &InputError{Field: "axial", Value: b.Axial.String(), Allowed: "from -1e12 to 1e12 kN"}
	}
	return nil
}

func (s *Solver) loadEdges(parts []Part, hogging bool) {
	s.edges = s.edges[:0]
	s.power = 1
	piece := len(s.law.pieces) - 1
	var at, above, slopeAbove float64
	for i := range parts {
		p := &parts[i]
		width, below := p.widths()
		end := p.Bottom.In(units.Metre) / s.depth
		if hogging {
			j := len(parts) - 1 - i
			below, width = parts[j].widths()
			if j > 0 { // the last ends at 1 either way
				end = 1 - parts[j-1].Bottom.In(units.Metre)/s.depth
			}
		}
		slope := 0.0
		if below != width {
			s.power = 2
			slope = (below - width) / (end - at)
		}
		if width != above || slope != slopeAbove {
			s.edges = append(s.edges, edge{at: at, weight: width - above, bend: slope - slopeAbove, width: width, slope: slope, piece: piece})
		}
		at, above, slopeAbove, piece = end, below, slope, -1
	}
	s.edges = append(s.edges, edge{at: 1, weight: -above, bend: -slopeAbove, piece: -1})
}

// onFace is the fraction of the depth below which a bar lies on the compression
// face itself.
const onFace = 1e-9

func (s *Solver) loadBars(layers []Layer, hogging bool) {
	s.bars = s.bars[:0]
	for i := range layers {
		l := &layers[i]
		at := l.Depth.In(units.Metre) / s.depth
		if hogging {
			at = 1 - at
		}
		if at < onFace {
			at = 0
		}
		yield := l.Steel.Yield.In(units.Pascal)
		elastic := l.Steel.Modulus.In(units.Pascal) * s.law.ultimate
		b := bar{
			at: at, area: l.Area.In(units.SquareMetre) / s.depth,
			elastic: elastic, yield: yield, yieldAt: yield / elastic,
			branch: tensionYield, piece: -1,
		}
		if at == 0 { // on the compression face: at the ultimate strain for good
			b.piece = len(s.law.pieces) - 1
			b.branch = elasticBranch
			if b.yieldAt <= 1 {
				b.branch = compressionYield
			}
		}
		s.bars = append(s.bars, b)
	}
}

// report writes the equilibrium at k, with each bar on the branch of its present
// state: a bar that stands at a jump is thus on the side where the root is. It
// returns the force against which the residual is to be judged.
func (s *Solver) report(dst *Ultimate, k float64) (size float64) {
	c := s.depth / k
	force, first, centroid := s.concrete(k)
	force *= c
	first *= c * c
	centroid *= s.depth

	sum := force - s.axial*s.depth
	size = math.Abs(force) + math.Abs(s.axial*s.depth)
	moment := force*centroid - first
	var tension, tensionFirst, side, sideFirst, extreme float64
	dst.Layers = slices.Grow(dst.Layers[:0], len(s.bars))
	for i := range s.bars {
		b := &s.bars[i]
		at, area := b.at*s.depth, b.area*s.depth
		strain := 1 - k*b.at
		stress, displaced := b.stress(strain), 0.0
		if s.deduct && b.piece >= 0 {
			p := &s.law.pieces[b.piece]
			displaced = p.stress.at(strain - p.from)
		}
		f := area * (stress - displaced)
		sum += f
		size += math.Abs(f)
		moment += f * (centroid - at)
		if strain < 0 {
			tension += area
			tensionFirst += area * at
		}
		if b.at > 0.5 {
			side += area
			sideFirst += area * at
		}
		extreme = max(extreme, b.at)
		dst.Layers = append(dst.Layers, LayerState{
			Depth:     units.Metre.Of(at),
			Strain:    strain * s.law.ultimate,
			Stress:    units.Pascal.Of(stress),
			Displaced: units.Pascal.Of(displaced),
			Force:     units.Newton.Of(f),
		})
	}

	dst.NeutralAxis = units.Metre.Of(c)
	dst.CompressionDepth = units.Metre.Of(min(s.depth, c*(1-s.law.pieces[0].from)))
	dst.Curvature = units.PerMetre.Of(s.law.ultimate / c)
	dst.Concrete = units.Newton.Of(force)
	dst.ConcreteDepth = units.Metre.Of(first / force)
	if len(s.bars) > 0 {
		dst.ExtremeDepth = units.Metre.Of(extreme * s.depth)
		dst.ExtremeStrain = (k*extreme - 1) * s.law.ultimate
	}
	if tension > 0 {
		dst.TensionArea = units.SquareMetre.Of(tension)
		dst.EffectiveDepth = units.Metre.Of(tensionFirst / tension)
	}
	if side > 0 {
		dst.TensionSideArea = units.SquareMetre.Of(side)
		dst.TensionSideDepth = units.Metre.Of(sideFirst / side)
	}
	dst.Nominal = units.NewtonMetre.Of(moment)
	dst.Residual = units.Newton.Of(sum)
	return size
}

// concrete returns the force of the concrete over the neutral-axis depth, its
// first moment about the compression face over the square of that depth, and
// the centroid of the whole section as a fraction of its depth.
func (s *Solver) concrete(k float64) (force, first, centroid float64) {
	var area, areaFirst float64
	for i := range s.edges[:len(s.edges)-1] {
		e := &s.edges[i]
		top, bottom, width := e.at, s.edges[i+1].at, e.width
		a := width * (bottom - top)
		area += a
		areaFirst += a * (bottom + top) / 2
		if e.slope != 0 { // the triangle beside the rectangle
			a = e.slope * (bottom - top) * (bottom - top) / 2
			area += a
			areaFirst += a * (top + 2*bottom) / 3
		}
		high, low := 1-k*top, 1-k*bottom
		for j := range s.law.pieces {
			from, to := max(low, s.law.pieces[j].from), min(high, s.law.end(j))
			switch {
			case !(from < to):
			case e.slope == 0:
				f, m := s.law.sum(j, from, to)
				force += width * f
				first += width * m
			default:
				f, m := s.law.taper(j, from, to, width+e.slope*(high-from)/k, width+e.slope*(high-to)/k)
				force += f
				first += m
			}
		}
	}
	return force, first, areaFirst / area
}

// axialLimits returns the axial forces, in N, that the section balances with the
// neutral axis at its compression face, and with no curvature at all.
func (s *Solver) axialLimits() (least, most float64) {
	crushed := s.law.at(1)
	for i := range s.edges[:len(s.edges)-1] {
		e := &s.edges[i]
		height := s.edges[i+1].at - e.at
		most += (e.width + e.slope*height/2) * height * crushed
	}
	if !s.deduct {
		crushed = 0
	}
	for i := range s.bars {
		b := &s.bars[i]
		squash := b.area * (min(b.elastic, b.yield) - crushed)
		most += squash
		if b.at == 0 {
			least += squash
		} else {
			least -= b.area * b.yield
		}
	}
	return least * s.depth, most * s.depth
}
