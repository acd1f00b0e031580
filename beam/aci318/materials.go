package aci318

import (
	"math"

	"soffit.example/beam"
	"soffit.example/units"
)

// materialRules are the values of chapters 19, 20 and 22.2 in the units of an
// edition.
type materialRules struct {
	density units.DensityUnit // lb/ft3 or kg/m3

	leastStrength float64 // of f'c, 19.2.1.1
	rootCap       float64 // on √f'c in 22.5.3.1, 22.7.2.1 and 25.4.1.4

	// β1 of Table 22.2.2.4.3: 0.85 up to blockFull, less by 0.05 for each
	// blockStep above it, and 0.65 from blockLeast on. In SI the line does not
	// meet 0.65 there: it is a branch, not a clamp.
	blockFull, blockLeast, blockStep float64

	concreteByDensity        float64 // 33 or 0.043 of 19.2.2.1(a)
	concreteByStrength       float64 // 57,000 or 4700 of 19.2.2.1(b)
	lightest, heaviest       float64 // densities of 19.2.2.1(a)
	lightLimit, normalLeast  float64 // densities that bound lightweight and normalweight concrete
	rupture                  float64 // 7.5 or 0.62 of 19.2.3.1
	usualDensity             float64 // of normalweight concrete with its bars; common practice
	usualAggregate           float64 // nominal maximum size; common practice
	lightweightByComposition bool    // λ of every kind from its composition, 19.2.4.2 of 318-14
	splitting                float64 // 6.7 or 0.56 of √fcm, 19.2.4.3 of 318-14; zero: no such route
	lambdaLow, lambdaHigh    float64 // densities between which λ is lambdaSlope times density, 19.2.4.1 of 318-19
	lambdaSlope              float64

	steelModulus     float64 // 20.2.2.2
	grade60          float64 // the yield strength for which roundedYield may be used, 21.2.2.1
	leastYield       float64 // lowest grade of Table 20.2.1.3
	mostYield        float64 // for bars in flexure, Table 20.2.2.4
	mostShearYield   float64 // for stirrups, Table 20.2.2.4
	mostTorsionYield float64 // for either direction, Table 20.2.2.4

	// Clauses that the editions number differently: of λ as such, by density, by
	// composition and by splitting strength.
	lambdaClause, densityClause, mixClause, splittingClause string
	yieldClause                                             string
}

const (
	crushing       = 0.003 // strain of the extreme concrete fibre, 22.2.2.1
	blockIntensity = 0.85  // of f'c, 22.2.2.4.1
	blockMost      = 0.85  // β1, Table 22.2.2.4.3
	blockLess      = 0.05
	blockLeast     = 0.65
	roundedYield   = 0.002 // 21.2.2.1, for Grade 60

	// Table 19.2.4.2 of 318-14, Table 19.2.4.1(b) of 318-19.
	lambdaNormal = 1.0
	lambdaSand   = 0.85
	lambdaAll    = 0.75
)

var materials14US = materialRules{
	density: units.PoundPerCubicFoot, leastStrength: 2500, rootCap: 100,
	blockFull: 4000, blockLeast: 8000, blockStep: 1000,
	concreteByDensity: 33, concreteByStrength: 57000, lightest: 90, heaviest: 160, lightLimit: 115, normalLeast: 135,
	rupture: 7.5, usualDensity: 150, usualAggregate: 0.75,
	lightweightByComposition: true, splitting: 6.7,
	steelModulus: 29e6, grade60: 60000, leastYield: 40000, mostYield: 80000, mostShearYield: 60000, mostTorsionYield: 60000,
	lambdaClause: "19.2.4.2", mixClause: "Table 19.2.4.2", splittingClause: "19.2.4.3", yieldClause: "Table 20.2.2.4a",
}

var materials14SI = materialRules{
	density: units.KilogramPerCubicMetre, leastStrength: 17, rootCap: 8.3,
	blockFull: 28, blockLeast: 55, blockStep: 7,
	concreteByDensity: 0.043, concreteByStrength: 4700, lightest: 1440, heaviest: 2560, lightLimit: 1840, normalLeast: 2160,
	rupture: 0.62, usualDensity: 2450, usualAggregate: 20,
	lightweightByComposition: true, splitting: 0.56,
	steelModulus: 200000, grade60: 420, leastYield: 280, mostYield: 550, mostShearYield: 420, mostTorsionYield: 420,
	lambdaClause: "19.2.4.2", mixClause: "Table 19.2.4.2", splittingClause: "19.2.4.3", yieldClause: "Table 20.2.2.4a",
}

var materials19US = materialRules{
	density: units.PoundPerCubicFoot, leastStrength: 2500, rootCap: 100,
	blockFull: 4000, blockLeast: 8000, blockStep: 1000,
	concreteByDensity: 33, concreteByStrength: 57000, lightest: 90, heaviest: 160, lightLimit: 135, normalLeast: 135,
	rupture: 7.5, usualDensity: 150, usualAggregate: 0.75,
	lambdaLow: 100, lambdaHigh: 135, lambdaSlope: 0.0075,
	steelModulus: 29e6, grade60: 60000, leastYield: 40000, mostYield: 100000, mostShearYield: 60000, mostTorsionYield: 60000,
	lambdaClause: "19.2.4.1", densityClause: "Table 19.2.4.1(a)", mixClause: "Table 19.2.4.1(b)", yieldClause: "Table 20.2.2.4(a)",
}

var materials19SI = materialRules{
	density: units.KilogramPerCubicMetre, leastStrength: 17, rootCap: 8.3,
	blockFull: 28, blockLeast: 55, blockStep: 7,
	concreteByDensity: 0.043, concreteByStrength: 4700, lightest: 1440, heaviest: 2560, lightLimit: 2160, normalLeast: 2160,
	rupture: 0.62, usualDensity: 2450, usualAggregate: 20,
	lambdaLow: 1600, lambdaHigh: 2160, lambdaSlope: 0.00047,
	steelModulus: 200000, grade60: 420, leastYield: 280, mostYield: 690, mostShearYield: 420, mostTorsionYield: 420,
	lambdaClause: "19.2.4.1", densityClause: "Table 19.2.4.1(a)", mixClause: "Table 19.2.4.1(b)", yieldClause: "Table 20.2.2.4(a)",
}

// blockFactor is β1, the depth of the stress block over that of the neutral
// axis (Table 22.2.2.4.3).
func (e *edition) blockFactor(strength units.Stress) float64 {
	m, fc := &e.materials, e.stressIn(strength)
	switch {
	case units.AtMost(fc, m.blockFull):
		return blockMost
	case units.AtMost(m.blockLeast, fc):
		return blockLeast
	}
	return blockMost - blockLess*(fc-m.blockFull)/m.blockStep
}

// isLight reports whether a kind of concrete holds lightweight aggregate.
func isLight(k beam.ConcreteKind) bool {
	return beam.Normalweight < k && k <= beam.CoarseBlend
}

// lightness is the factor for lightweight concrete, λ, with where it is from.
type lightness struct {
	factor float64
	clause string
	route  string // how it was found; empty for normalweight concrete
}

// What is said of the route to λ.
const (
	routeMix       = "by the composition of the aggregate"
	routeDensity   = "by the equilibrium density"
	routeSplitting = "by the splitting tensile strength"
)

// lambda is the factor for lightweight concrete (19.2.4).
func (e *edition) lambda(c *beam.Concrete) float64 { return e.lightness(c).factor }

// lightness finds λ: 1 for normalweight concrete. In 318-14 it follows from the
// splitting tensile strength where that is given, else from the composition; in
// 318-19, which leaves the choice, from the composition of blends, whose mix is
// stated, and from the equilibrium density of the other kinds.
func (e *edition) lightness(c *beam.Concrete) lightness {
	m := &e.materials
	switch {
	case !isLight(c.Kind):
		return lightness{factor: lambdaNormal, clause: m.lambdaClause}
	case m.splitting > 0 && !c.Splitting.IsZero():
		return lightness{min(e.stressIn(c.Splitting)/(m.splitting*e.sqrtStrength(c.Strength)), lambdaNormal), m.splittingClause, routeSplitting}
	case m.lightweightByComposition || c.Kind == beam.FineBlend || c.Kind == beam.CoarseBlend:
		return lightness{lambdaOfMix(c), m.mixClause, routeMix}
	}
	l := lightness{lambdaNormal, m.densityClause, routeDensity}
	switch wc := c.Density.In(m.density); {
	case units.AtMost(wc, m.lambdaLow):
		l.factor = lambdaAll
	case units.AtMost(wc, m.lambdaHigh):
		l.factor = min(m.lambdaSlope*wc, lambdaNormal)
	}
	return l
}

// lambdaOfMix is λ by composition: of blends in a straight line between the
// mixes without and with normalweight aggregate only, by absolute volume.
func lambdaOfMix(c *beam.Concrete) float64 {
	switch c.Kind {
	case beam.SandLightweight:
		return lambdaSand
	case beam.FineBlend:
		return lambdaAll + (lambdaSand-lambdaAll)*c.Normal
	case beam.CoarseBlend:
		return lambdaSand + (lambdaNormal-lambdaSand)*c.Normal
	}
	return lambdaAll
}

// elasticModulus is Ec of 19.2.2.1 and the expression used: (b) for
// normalweight concrete, (a) for lightweight.
func (e *edition) elasticModulus(c *beam.Concrete) (modulus units.Stress, expression string) {
	m, root := &e.materials, e.sqrtStrength(c.Strength)
	if isLight(c.Kind) {
		wc := c.Density.In(m.density)
		return e.stressOf(m.concreteByDensity * wc * math.Sqrt(wc) * root), "19.2.2.1.a"
	}
	return e.stressOf(m.concreteByStrength * root), "19.2.2.1.b"
}

// ruptureModulus is fr of 19.2.3.1.
func (e *edition) ruptureModulus(c *beam.Concrete) units.Stress {
	return e.stressOf(e.materials.rupture * e.lambda(c) * e.sqrtStrength(c.Strength))
}

// steelModulus is Es of 20.2.2.2.
func (e *edition) steelModulus() units.Stress { return e.stressOf(e.materials.steelModulus) }

// isGrade60 reports whether bars are Grade 60 (420), for which 21.2.2.1 permits
// a yield strain of 0.002.
func (e *edition) isGrade60(yield units.Stress) bool {
	fy := e.stressIn(yield)
	return units.AtMost(fy, e.materials.grade60) && units.AtMost(e.materials.grade60, fy)
}

// yieldStrain is εty of 21.2.2.1, by which strains are classed. It never enters
// the stresses, which follow 20.2.2.1.
func (e *edition) yieldStrain(yield units.Stress, rounded bool) float64 {
	if rounded && e.isGrade60(yield) {
		return roundedYield
	}
	return e.stressIn(yield) / e.materials.steelModulus
}

// shearYield is fyt as it may be used in calculating shear strength (Table
// 20.2.2.4), and whether the cap acted.
func (e *edition) shearYield(yield units.Stress) (used units.Stress, capped bool) {
	if units.AtMost(e.stressIn(yield), e.materials.mostShearYield) {
		return yield, false
	}
	return e.stressOf(e.materials.mostShearYield), true
}

// materialRefusals names the material limits that a design outside the tables
// of chapters 19 and 20 breaks. No strength may be given then.
func (e *edition) materialRefusals(c *beam.Concrete, yield units.Stress) []beam.Refusal {
	var out []beam.Refusal
	if least := e.stressOf(e.materials.leastStrength); !least.AtMost(c.Strength) {
		out = append(out, beam.Refusal{
			Rule: "scope.concrete-strength", Clause: "19.2.1.1",
			Detail: "specified strength " + e.stress.Format(c.Strength) + " is below the least for structural concrete, " + e.stress.Format(least),
		})
	}
	return append(out, e.steelRefusals(yield)...)
}

// steelRefusals names the limits of yield strength that bars in flexure break.
func (e *edition) steelRefusals(yield units.Stress) []beam.Refusal {
	m := &e.materials
	least, most := e.stressOf(m.leastYield), e.stressOf(m.mostYield)
	r := beam.Refusal{Rule: "scope.steel-grade"}
	switch {
	case !least.AtMost(yield):
		r.Clause = "Table 20.2.1.3"
		r.Detail = "yield strength " + e.stress.Format(yield) + " is below the lowest grade of the standard's tables, " + e.stress.Format(least)
	case !yield.AtMost(most):
		r.Clause = m.yieldClause
		r.Detail = "yield strength " + e.stress.Format(yield) + " is above the greatest that bars in flexure may count with, " + e.stress.Format(most)
	default:
		return nil
	}
	return []beam.Refusal{r}
}

// densityFault is a density that is not that of the kind of concrete, or that
// is missing where lightweight concrete needs it.
func (e *edition) densityFault(c *beam.Concrete) (fault beam.Fault, wrong bool) {
	m := &e.materials
	light := isLight(c.Kind)
	least, most := m.density.Of(m.normalLeast), m.density.Of(m.heaviest)
	if light {
		least, most = m.density.Of(m.lightest), m.density.Of(m.lightLimit)
	}
	if c.Kind == beam.CoarseBlend { // it leads over to normalweight concrete
		most = m.density.Of(m.normalLeast)
	}
	fault = beam.Fault{Path: "/concrete/density", Allowed: m.density.Format(least) + " to " + m.density.Format(most)}
	switch {
	case c.Density.IsZero() && light:
		fault.Detail = "the density of lightweight concrete is missing: self-weight, λ and least depth depend on it"
	case c.Density.IsZero():
		return fault, false
	case !(least.AtMost(c.Density) && c.Density.AtMost(most)):
		fault.Detail = "density " + m.density.Format(c.Density) + " is not that of " + c.Kind.String() + " concrete"
	default:
		return fault, false
	}
	return fault, true
}

// Materials is what an edition makes of a concrete and its steel.
type Materials struct {
	BlockFactor      float64 // β1, Table 22.2.2.4.3
	Lambda           float64 // for lightweight concrete, 19.2.4
	ElasticModulus   units.Stress
	ModulusClause    string       // the expression of 19.2.2.1 that gave it
	RuptureModulus   units.Stress // 19.2.3.1
	SteelModulus     units.Stress // 20.2.2.2
	YieldStrain      float64      // of the longitudinal bars, 21.2.2.1
	ShearYield       units.Stress // of stirrups as used in shear, Table 20.2.2.4
	ShearYieldCapped bool         // the stirrups are stronger than may be used
	Refusals         []beam.Refusal
}

// Materials gives the properties of a concrete and its steel. The density of
// lightweight concrete must be given; that of normalweight is not used.
func (c Code) Materials(concrete beam.Concrete, steel beam.Reinforcement, r beam.Readings) Materials {
	e := c.e
	m := Materials{
		BlockFactor:    e.blockFactor(concrete.Strength),
		Lambda:         e.lambda(&concrete),
		RuptureModulus: e.ruptureModulus(&concrete),
		SteelModulus:   e.steelModulus(),
		YieldStrain:    e.yieldStrain(steel.Yield, r.RoundedYield),
		Refusals:       e.materialRefusals(&concrete, steel.Yield),
	}
	m.ElasticModulus, m.ModulusClause = e.elasticModulus(&concrete)
	stirrups := steel.StirrupYield
	if stirrups.IsZero() {
		stirrups = steel.Yield
	}
	m.ShearYield, m.ShearYieldCapped = e.shearYield(stirrups)
	return m
}
