package aci318

import (
	"math"

	"soffit.example/beam"
	"soffit.example/units"
)

// torsionRules are the coefficients of threshold and cracking torsion of
// solid sections (22.7.4.1, 22.7.5.1), in the units of an edition.
type torsionRules struct {
	threshold float64 // of λ√f'c Acp²/pcp
	cracking  float64
	axial     float64 // 1 + Nu/(4 Ag λ√f'c) under the root
}

var (
	torsionUS = torsionRules{threshold: 1, cracking: 4, axial: 4}
	torsionSI = torsionRules{threshold: 0.083, cracking: 0.33, axial: 0.33}
)

// torsionStrength is what 22.7 knows of a solid rectangle before stirrups are
// designed for torsion, in the units of the edition.
type torsionStrength struct {
	root, lambda float64 // √f'c is capped without exception, 22.7.2.1
	rootCapped   bool
	width, depth float64
	area         float64 // Acp, for a solid section Ag too
	perimeter    float64 // pcp
	axial        float64 // Nu
	axialFactor  float64
	threshold    float64 // Tth
	cracking     float64 // Tcr
	phi          float64
}

// torsionStrength evaluates a rectangle under an axial force, compression
// positive.
func (e *edition) torsionStrength(section beam.Section, c *beam.Concrete, axial units.Force) torsionStrength {
	r := &e.torsion
	t := torsionStrength{
		root: e.sqrtStrength(c.Strength), lambda: e.lambda(c),
		width: e.lengthIn(section.Width), depth: e.lengthIn(section.Depth),
		axial: e.forceIn(axial), axialFactor: 1, phi: e.reduction.torsion,
	}
	if t.root > e.materials.rootCap {
		t.root, t.rootCapped = e.materials.rootCap, true
	}
	t.area, t.perimeter = t.width*t.depth, 2*(t.width+t.depth)
	if t.axial != 0 {
		t.axialFactor = math.Sqrt(max(0, 1+t.axial/(r.axial*t.area*t.lambda*t.root)))
	}
	unit := t.lambda * t.root * t.area * t.area / t.perimeter * t.axialFactor
	t.threshold, t.cracking = r.threshold*unit, r.cracking*unit
	return t
}

// neglects reports whether a torque may be neglected: it must be less than
// φTth, not equal to it (9.5.4.1).
func (t *torsionStrength) neglects(e *edition, torque units.Moment) bool {
	return !units.AtMost(t.phi*t.threshold, math.Abs(e.momentIn(torque)))
}

// judgeTorsion appends whether the torque may be neglected. One that may not
// is refused before any layout is judged.
func (e *edition) judgeTorsion(dst []beam.Check, t *beam.Trial) []beam.Check {
	c := beam.Check{ID: "torsion.threshold", Clause: "9.5.4.1"}
	a, s, ok := e.worstTorque(t.Problem)
	if !ok {
		c.Outcome, c.Reason = beam.NotApplicable, "no torque acts"
		return append(dst, c)
	}
	c.Span, c.At, c.HasAt, c.Combination = a.Span, a.At, a.Span > 0, a.Combination
	c.Compare(a.Torque.Abs().Amount(), e.momentOf(s.phi*s.threshold).Amount())
	if c.Outcome == beam.Pass && !s.neglects(e, a.Torque) {
		c.Outcome, c.Reason = beam.Fail, "a torque equal to the threshold may not be neglected"
	}
	if t.Record {
		c.Steps = s.steps(e)
	}
	return append(dst, c)
}

func (t *torsionStrength) steps(e *edition) []beam.Step {
	r := &e.torsion
	var out working
	out.given("λ", "factor for lightweight concrete", e.materials.lambdaClause, asPlain(t.lambda))
	out.given("r", "root of the concrete strength", "22.7.2.1", e.asStress(t.root))
	if t.rootCapped {
		out.note("capped")
	}
	out.given("b", "width", "", e.asLength(t.width))
	out.given("h", "overall depth", "", e.asLength(t.depth))
	out.find("Acp", "area enclosed by the outside perimeter", "22.7.4.1", "b h", e.asArea(t.area))
	out.find("pcp", "outside perimeter", "22.7.4.1", "2 (b + h)", e.asLength(t.perimeter))
	expression := number(r.threshold) + " λ r Acp^2 / pcp"
	if t.axial != 0 {
		out.given("Nu", "factored axial force, compression positive", "", e.asForce(t.axial))
		out.find("k", "factor for the axial force", "22.7.4.1",
			"√(max(0, 1 + Nu / ("+number(r.axial)+" Acp λ r)))", asPlain(t.axialFactor))
		expression += " k"
	}
	out.find("Tth", "threshold torsion", "22.7.4.1", expression, e.asMoment(t.threshold))
	out.given("φ", "strength reduction factor for torsion", "Table 21.2.1", asPlain(t.phi))
	out.find("φTth", "torque below which torsion may be neglected", "9.5.4.1", "φ Tth", e.asMoment(t.phi*t.threshold))
	return out.steps
}

// twists reports whether some torque of a problem may not be neglected.
func (e *edition) twists(p *beam.Problem) bool {
	a, t, ok := e.worstTorque(p)
	return ok && !t.neglects(e, a.Torque)
}
