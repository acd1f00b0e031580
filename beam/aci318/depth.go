package aci318

import (
	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// depthRules are Table 9.3.1.1 and its multipliers, in the units of an
// edition.
type depthRules struct {
	simple, oneEnd, bothEnds, cantilever float64 // length over least depth

	yieldBase, yieldPer float64 // 0.4 + fy/100,000, 9.3.1.1.1
	lightLow, lightHigh float64 // densities of lightweight concrete, 9.3.1.1.2
	lightBase, lightPer float64 // 1.65 - 0.005 wc
	lightLeast          float64
}

var (
	depthUS = depthRules{
		simple: 16, oneEnd: 18.5, bothEnds: 21, cantilever: 8,
		yieldBase: 0.4, yieldPer: 100000, lightLow: 90, lightHigh: 115, lightBase: 1.65, lightPer: 0.005, lightLeast: 1.09,
	}
	depthSI = depthRules{
		simple: 16, oneEnd: 18.5, bothEnds: 21, cantilever: 8,
		yieldBase: 0.4, yieldPer: 700, lightLow: 1440, lightHigh: 1840, lightBase: 1.65, lightPer: 0.0003, lightLeast: 1.09,
	}
)

// tableDepth is the least depth of a span by Table 9.3.1.1.
type tableDepth struct {
	length   float64 // ℓ: the span, or the clear projection of a cantilever
	divisor  float64
	support  string
	yield    float64 // fy
	byYield  float64
	density  float64 // wc
	byWeight float64 // 1 for normalweight concrete
	depth    float64
}

// tableDepth evaluates a span. A fixed end counts as continuous.
func (e *edition) tableDepth(p *beam.Problem, span int) tableDepth {
	r, b := &e.depth, &p.Brief
	d := tableDepth{length: e.lengthIn(b.Spans[span-1]), divisor: r.simple, support: "simply supported", byWeight: 1}
	left, right := b.Supports[span-1].Kind, b.Supports[span].Kind
	switch {
	case left == statics.Free || right == statics.Free:
		d.length, d.divisor, d.support = e.lengthIn(p.ClearSpan(span)), r.cantilever, "cantilever"
	case left == statics.Fixed && right == statics.Fixed:
		d.divisor, d.support = r.bothEnds, "both ends continuous"
	case left == statics.Fixed || right == statics.Fixed:
		d.divisor, d.support = r.oneEnd, "one end continuous"
	}
	d.yield = e.stressIn(b.Reinforcement.Yield)
	d.byYield = r.yieldBase + d.yield/r.yieldPer
	if isLight(b.Concrete.Kind) {
		d.density = b.Concrete.Density.In(e.materials.density)
		if units.AtMost(r.lightLow, d.density) && units.AtMost(d.density, r.lightHigh) {
			d.byWeight = max(r.lightBase-r.lightPer*d.density, r.lightLeast)
		}
	}
	d.depth = d.length / d.divisor * d.byYield * d.byWeight
	return d
}

// What is said of depths and deflections.
const (
	noteShallow   = "shallower than the table: only a computed deflection (24.2) could justify it, and this version does not compute one"
	noteFragile   = "the beam carries construction likely to be damaged, for which the table of least depths does not stand in for a computed deflection (9.3.1.1); this version does not compute one"
	noteTableDoes = "the depth is at least that of the table, and nothing likely to be damaged is attached (9.3.1.1, 9.3.2.1)"
	noteNoSpans   = "no spans are given, and least depth and deflection follow from them"
)

// appendDepth appends the least depth of each span, and whether a computed
// deflection is wanted besides.
func (e *edition) appendDepth(dst []beam.Check, t *beam.Trial) []beam.Check {
	if t.Forces.Spans() == 0 {
		return append(dst,
			beam.NotJudgedCheck("depth.minimum", "Table 9.3.1.1", noteNoSpans),
			beam.NotJudgedCheck("deflection.computed", "9.3.2.1", noteNoSpans))
	}
	shallow := false
	for span := 1; span <= t.Forces.Spans(); span++ {
		d := e.tableDepth(t.Problem, span)
		c := beam.Check{ID: "depth.minimum", Clause: "Table 9.3.1.1", Span: span, Reason: d.support}
		c.Compare(e.lengthOf(d.depth).Amount(), t.Brief.Section.Depth.Amount())
		if c.Outcome == beam.Fail {
			shallow = true
			c.Reason = noteShallow
		}
		if t.Record {
			c.Steps = d.steps(e)
		}
		dst = append(dst, c)
	}
	switch {
	case t.Brief.Serviceability.Attached == beam.Fragile:
		return append(dst, beam.NotJudgedCheck("deflection.computed", "9.3.2.1", noteFragile))
	case shallow:
		return append(dst, beam.NotJudgedCheck("deflection.computed", "9.3.2.1", noteShallow))
	}
	return append(dst, beam.NotApplicableCheck("deflection.computed", "9.3.2.1", noteTableDoes))
}

func (d *tableDepth) steps(e *edition) []beam.Step {
	r := &e.depth
	var out working
	out.given("ℓ", "span, or the clear projection of a cantilever", "", e.asLength(d.length))
	out.note(d.support)
	out.given("fy", "yield strength of the bars", "", e.asStress(d.yield))
	out.find("kf", "multiplier for yield strength", "9.3.1.1.1", number(r.yieldBase)+" + fy / "+number(r.yieldPer), asPlain(d.byYield))
	expression := "ℓ / " + number(d.divisor) + " kf"
	if d.byWeight != 1 {
		density := measured{e.materials.density.Of(d.density).Amount(), e.materials.density.String()}
		out.given("wc", "density of the concrete", "", density)
		out.find("kw", "multiplier for lightweight concrete", "9.3.1.1.2",
			"max("+number(r.lightBase)+" - "+number(r.lightPer)+" wc, "+number(r.lightLeast)+")", asPlain(d.byWeight))
		expression += " kw"
	}
	out.find("h,min", "least overall depth", "Table 9.3.1.1", expression, e.asLength(d.depth))
	return out.steps
}
