package aci318

import (
	"math"

	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// sizing turns the strength in bending round: it is what the tension steel for
// a moment depends on, in the units of the edition. Lengths are measured from
// the compression face of the section bent in its sense.
type sizing struct {
	fc, fy, beta1  float64
	depth, extreme float64 // d and dt
	yieldStrain    float64
	reduction      *reductionRules

	parts   []mechanics.Part
	height  float64 // h
	unit    units.LengthUnit
	hogging bool
}

// sizing prepares a section of parts for one sense, with the centroid of its
// tension steel at depth and the extreme layer at extreme.
func (e *edition) sizing(parts []mechanics.Part, s beam.Sense, strength, yield units.Stress, depth, extreme units.Length, rounded bool) sizing {
	return sizing{
		fc: e.stressIn(strength), fy: e.stressIn(yield), beta1: e.blockFactor(strength),
		depth: e.lengthIn(depth), extreme: e.lengthIn(extreme),
		yieldStrain: e.yieldStrain(yield, rounded), reduction: &e.reduction,
		parts: parts, height: e.lengthIn(parts[len(parts)-1].Bottom), unit: e.length, hogging: s == beam.Negative,
	}
}

// trialSizing is the sizing of a trial's section about the steel that lies at
// the tension face of a sense. Bars of several grades count with the least of
// their yield strengths, which asks for no less steel than they need, and are
// classed by the greatest.
func (e *edition) trialSizing(t *beam.Trial, s beam.Sense) sizing {
	b, steel := &t.Brief, tensionSteel(t, s)
	least, most := faceYields(t, s)
	z := e.sizing(t.Geometry.Parts, s, b.Concrete.Strength, least, steel.depth, steel.extreme, b.Readings.RoundedYield)
	z.yieldStrain = e.yieldStrain(most, b.Readings.RoundedYield)
	return z
}

// faceYield is the least yield strength of the bars at the tension face of a
// sense.
func faceYield(t *beam.Trial, s beam.Sense) units.Stress {
	least, _ := faceYields(t, s)
	return least
}

// faceYields are the least and the greatest yield strength of the bars at the
// tension face of a sense.
func faceYields(t *beam.Trial, s beam.Sense) (least, most units.Stress) {
	rows := t.Steel(s.TensionFace()).Rows
	if len(rows) == 0 {
		return t.Brief.Reinforcement.Yield, t.Brief.Reinforcement.Yield
	}
	least, most = rows[0].Yield, rows[0].Yield
	for i := range rows[1:] {
		least, most = least.Min(rows[i+1].Yield), most.Max(rows[i+1].Yield)
	}
	return least, most
}

// strip is the i-th part of the section from its compression face: from x1 to
// x2, of width w1 at x1 and w2 at x2.
func (z *sizing) strip(i int) (x1, x2, w1, w2 float64) {
	p := &z.parts[i]
	if z.hogging {
		p = &z.parts[len(z.parts)-1-i]
	}
	top, bottom := p.Widths()
	x1, x2, w1, w2 = p.Top.In(z.unit), p.Bottom.In(z.unit), top.In(z.unit), bottom.In(z.unit)
	if z.hogging {
		x1, x2, w1, w2 = z.height-x2, z.height-x1, w2, w1
	}
	return x1, x2, w1, w2
}

// upper is the area of a strip's first h, and its moment about its own upper
// edge, for a width of w there that changes by slope.
func upper(h, w, slope float64) (area, first float64) {
	return h * (w + slope*h/2), h * h * (w/2 + slope*h/3)
}

// concrete is the area of the section down to x, and its moment about the
// compression face.
func (z *sizing) concrete(x float64) (area, first float64) {
	for i := range z.parts {
		x1, x2, w1, w2 := z.strip(i)
		if x <= x1 {
			break
		}
		a, f := upper(math.Min(x, x2)-x1, w1, (w2-w1)/(x2-x1))
		area += a
		first += f + a*x1
	}
	return area, first
}

// intensity is the stress of the block.
func (z *sizing) intensity() float64 { return blockIntensity * z.fc }

// axisAt is the depth of the neutral axis at which the extreme layer has a
// strain.
func (z *sizing) axisAt(strain float64) float64 {
	return z.extreme * crushing / (crushing + strain)
}

func (z *sizing) strainAt(axis float64) float64 {
	return crushing * (z.extreme - axis) / axis
}

// nominal is Mn, of the concrete about the tension steel, with the neutral axis
// at a depth.
func (z *sizing) nominal(axis float64) float64 {
	area, first := z.concrete(z.beta1 * axis)
	return z.intensity() * (area*z.depth - first)
}

// phi is φ with the neutral axis at a depth.
func (z *sizing) phi(axis float64) float64 {
	phi, _ := z.reduction.flexure(z.strainAt(axis), z.yieldStrain)
	return phi
}

// design is φMn with the neutral axis at a depth.
func (z *sizing) design(axis float64) float64 { return z.phi(axis) * z.nominal(axis) }

// axisFor is the neutral axis that gives a nominal moment; NaN where none does.
// The moment about the steel grows with the block as long as the block ends
// above the steel, so that the strip in which it ends is found first.
func (z *sizing) axisFor(nominal float64) float64 {
	rest := nominal / z.intensity()
	for i := range z.parts {
		x1, x2, w1, w2 := z.strip(i)
		slope, lever, most := (w2-w1)/(x2-x1), z.depth-x1, math.Min(x2, z.depth)-x1
		if most <= 0 {
			break
		}
		area, first := upper(most, w1, slope)
		whole := area*lever - first
		if rest > whole && x2 < z.depth {
			rest -= whole
			continue
		}
		if slope == 0 {
			// w h (lever - h/2) = rest: the lesser root, in the form that does not
			// subtract like numbers. NaN where the radicand is negative.
			q := rest / (w1 * lever * lever)
			return (x1 + 2*q*lever/(1+math.Sqrt(1-2*q))) / z.beta1
		}
		if rest > whole {
			break
		}
		return (x1 + taperedBlock(rest, lever, w1, slope, most)) / z.beta1
	}
	return math.NaN()
}

// halvings of an interval leave nothing of it but rounding.
const halvings = 60

// taperedBlock is the height h, at most most, of a strip of width w at its upper
// edge that changes by slope, whose moment about a point lever below that edge
// is rest. It is the root of a cubic that grows on [0, most].
func taperedBlock(rest, lever, w, slope, most float64) float64 {
	low, high := 0.0, most
	for range halvings {
		h := (low + high) / 2
		if area, first := upper(h, w, slope); area*lever-first < rest {
			low = h
		} else {
			high = h
		}
	}
	return (low + high) / 2
}

// requiredTension is the tension steel that a moment needs in a section without
// compression steel, in every step and in the units of the edition. All of the
// steel is taken to yield, which the strain limit of 9.3.3.1 ensures for the
// extreme layer.
type requiredTension struct {
	block, axis float64 // a and c
	strain      float64 // εt
	phi         float64
	concrete    float64 // area under the block
	area        float64
	ok          bool // false: no amount of tension steel alone would do
}

// tension is the least tension steel for a factored moment.
func (z *sizing) tension(moment float64) requiredTension {
	full, limit := z.axisAt(z.reduction.tensionStrain(z.yieldStrain)), z.axisAt(z.reduction.leastStrain(z.yieldStrain))
	axis := z.axisFor(moment / z.reduction.tension)
	if !(units.AtMost(axis, full)) { // also where no axis gives the moment
		if axis = z.axisBetween(full, limit, moment); math.IsNaN(axis) {
			return requiredTension{}
		}
	}
	r := requiredTension{block: z.beta1 * axis, axis: axis, strain: z.strainAt(axis), phi: z.phi(axis), ok: true}
	r.concrete, _ = z.concrete(r.block)
	r.area = z.intensity() * r.concrete / z.fy
	return r
}

// axisBetween is the least depth of the neutral axis in the transition, from
// full to limit, that gives a factored moment; NaN where none does. φ falls
// there as Mn grows, and their product may rise or fall. Where the least strain
// is that of tension control there is no transition.
func (z *sizing) axisBetween(full, limit, moment float64) float64 {
	const steps = 64
	if limit <= full {
		if units.AtMost(moment, z.design(full)) {
			return full
		}
		return math.NaN()
	}
	low := full
	for i := 1; i <= steps; i++ {
		high := full + (limit-full)*float64(i)/steps
		if !units.AtMost(moment, z.design(high)) {
			low = high
			continue
		}
		for range halvings {
			mid := (low + high) / 2
			if z.design(mid) < moment {
				low = mid
			} else {
				high = mid
			}
		}
		return high
	}
	return math.NaN()
}

// requiredArea is the tension steel, at the depth of the steel that lies at the
// tension face of a sense, for a factored moment and an axial force, compression
// positive, that act together. Compression steel helps where the trial relies
// on it and tension steel alone does not do. ok is false where no tension steel
// would do.
//
// As in [edition.trialFlexure] an axial force may add to the steel and takes
// nothing off it.
func (e *edition) requiredArea(t *beam.Trial, s beam.Sense, moment units.Moment, axial units.Force) (area units.Area, ok bool) {
	z := e.trialSizing(t, s)
	as, ok := z.steel(e, t, s, math.Abs(e.momentIn(moment)), e.forceIn(axial))
	return e.areaOf(as), ok
}

// steel is requiredArea of a sizing that is kept from one moment to the next.
func (z *sizing) steel(e *edition, t *beam.Trial, s beam.Sense, moment, axial float64) (area float64, ok bool) {
	area, ok = z.tensionWith(e, t, s, moment, 0)
	if axial == 0 || !ok {
		return area, ok
	}
	with, ok := z.tensionWith(e, t, s, moment, axial)
	return math.Max(area, with), ok
}

// tensionWith is the tension steel for a moment and an axial force. Both take
// their part of φ: about the tension steel the section must give
// φMn = Mu + Pu (d - yc), with yc the depth of the centroid of the concrete,
// and As fy = C - Pu/φ.
func (z *sizing) tensionWith(e *edition, t *beam.Trial, s beam.Sense, moment, axial float64) (area float64, ok bool) {
	if axial != 0 {
		gross, first := z.concrete(z.height)
		moment += axial * (z.depth - first/gross)
		if moment <= 0 {
			// Tension acts below the steel of this face: less than all of it comes
			// on that steel.
			return -axial / (z.reduction.tension * z.fy), true
		}
	}
	if moment == 0 {
		return 0, true
	}
	r := z.tension(moment)
	if r.ok {
		return math.Max(0, r.area-axial/(r.phi*z.fy)), true
	}
	if !t.Steel(s.TensionFace().Opposite()).InCompression {
		return 0, false
	}
	return z.tensionAndPressed(e, t, s, moment, axial)
}

// tensionAndPressed counts the compression steel that the trial has, in a section
// that is tension-controlled. φMn grows there with the neutral axis, but for a
// small drop where the block passes a layer.
func (z *sizing) tensionAndPressed(e *edition, t *beam.Trial, s beam.Sense, moment, axial float64) (area float64, ok bool) {
	phi := z.reduction.tension
	low, high := 0.0, z.axisAt(z.reduction.tensionStrain(z.yieldStrain))
	design := func(axis float64) float64 {
		_, about := z.pressed(e, t, s, axis)
		return phi * (z.nominal(axis) + about)
	}
	if !units.AtMost(moment, design(high)) {
		return 0, false
	}
	for range halvings {
		mid := (low + high) / 2
		if design(mid) < moment {
			low = mid
		} else {
			high = mid
		}
	}
	force, _ := z.pressed(e, t, s, high)
	concrete, _ := z.concrete(z.beta1 * high)
	return (z.intensity()*concrete + force - axial/phi) / z.fy, true
}

// pressed is the force of the trial's compression steel with the neutral axis at
// a depth, less the concrete it displaces, and its moment about the tension
// steel.
func (z *sizing) pressed(e *edition, t *beam.Trial, s beam.Sense, axis float64) (force, moment float64) {
	f := t.Steel(s.TensionFace().Opposite())
	for i := range f.Rows {
		r := &f.Rows[i]
		if r.Flange {
			continue // no stirrup ties it
		}
		at, fy := e.lengthIn(r.Height), e.stressIn(r.Yield)
		stress := math.Max(-fy, math.Min(fy, e.materials.steelModulus*crushing*(axis-at)/axis))
		if at <= z.beta1*axis && !t.Brief.Readings.IgnoreDisplaced {
			stress -= z.intensity()
		}
		p := e.areaIn(r.Area) * stress
		force += p
		moment += p * (z.depth - at)
	}
	return force, moment
}
