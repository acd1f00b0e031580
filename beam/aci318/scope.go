package aci318

import (
	"fmt"
	"slices"

	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// scopeRules are the limits beyond which the sectional method does not apply.
type scopeRules struct {
	deepSpan float64 // of h: clear span of a deep beam, 9.9.1.1(a)
	deepLoad float64 // of h: from the face of a support to a concentrated load, 9.9.1.1(b)
	axial    float64 // of f'c Ag: from which axial compression counts, 9.3.3.1 and 9.5.2.2
}

var (
	scopeUS = scopeRules{deepSpan: 4, deepLoad: 2, axial: 0.10}
	scopeSI = scopeRules{deepSpan: 4, deepLoad: 2, axial: 0.10}
)

// scopeWords is what every edition refuses, or leaves out, in words.
var scopeWords = []string{
	"deep beams: clear spans of at most 4h, cantilevers of at most 2h (9.9)",
	"concentrated loads within 2h of the face of a support, among them distributed loads of which more than half lies within a length h (9.9)",
	"axial compression of at least 0.10 f'c Ag (22.4)",
	"concrete below the least strength of 19.2.1.1",
	"bars that are not of ASTM sizes (20.2.1.3), or stronger than Table 20.2.2.4 allows",
	"openings, prestress and shotcrete",
	"seismic detailing (chapter 18), and strut-and-tie design (chapter 23)",
	"not judged, and named so where a result calls for it: development, splices and cut-off of bars (9.7, 25.4, 25.5), bearing on supports (22.8), computed deflections (24.2), slab steel across a flange (7.5.2.3), ledges (16.5)",
}

// scopeOf names every rule that puts a problem outside the method.
func (e *edition) scopeOf(p *beam.Problem) []beam.Refusal {
	b := &p.Brief
	out := e.materialRefusals(&b.Concrete, b.Reinforcement.Yield)
	out = append(out, barRefusals(b)...)
	for span := 1; span <= p.Forces.Spans(); span++ {
		out = append(out, e.deepRefusals(p, span)...)
	}
	for _, d := range p.Forces.Demands() {
		out = append(out, e.axialRefusals(p.Geometry.Gross, &b.Concrete, d.Axial, d.Combination)...)
	}
	return out
}

// barRefusals names a catalog that the standard does not know.
func barRefusals(b *beam.Brief) []beam.Refusal {
	if known := []string{"astm-inch", "astm-metric"}; !slices.Contains(known, b.Reinforcement.Catalog) {
		return []beam.Refusal{{
			Rule: "scope.bar-catalog", Clause: "20.2.1.3",
			Detail: fmt.Sprintf("bars of catalog %s are not bars of the ASTM standards that 20.2.1.3 names; those of %s and %s are", b.Reinforcement.Catalog, known[0], known[1]),
		}}
	}
	return nil
}

// deepRefusals names what makes a span, or a part of it, a deep beam. The
// limit of 9.9.1.1 is put for spans between supports; half of it is taken for
// the projection of a cantilever, which is half of such a span.
func (e *edition) deepRefusals(p *beam.Problem, span int) []beam.Refusal {
	b, r := &p.Brief, &e.scope
	var out []beam.Refusal
	h, clear := b.Section.Depth, p.ClearSpan(span)
	limit, what := r.deepSpan, "clear span"
	if b.Supports[span-1].Kind == statics.Free || b.Supports[span].Kind == statics.Free {
		limit, what = r.deepSpan/2, "projection"
	}
	if clear.AtMost(h.Scale(limit)) {
		out = append(out, beam.Refusal{
			Rule: "scope.deep-beam", Clause: "9.9.1.1(a)",
			Detail: fmt.Sprintf("%s %s of span %d is at most %g h = %s: a deep beam, to be designed by 9.9 or chapter 23",
				what, beam.Short(e.system, clear.Amount()), span, limit, beam.Short(e.system, h.Scale(limit).Amount())),
		})
	}
	left, right := p.Faces(span)
	slip := b.Spans[span-1].Scale(noLength) // a load at the face is not off it by rounding
	for _, l := range concentratedLoads(p, span) {
		a, z := l.from, l.to
		// How far the load's near and far ends are from each face.
		for end, reach := range [2][2]units.Length{{a.Sub(left), z.Sub(left)}, {right.Sub(z), right.Sub(a)}} {
			s := &b.Supports[span-1+end]
			from := reach[0].Max(units.Length{})
			if s.Kind == statics.Free || s.Hung || reach[1].AtMost(slip) || !from.AtMost(h.Scale(r.deepLoad)) {
				continue
			}
			out = append(out, beam.Refusal{
				Rule: "scope.load-within-2h", Clause: "9.9.1.1(b)",
				Detail: fmt.Sprintf("load %d acts %s from the face of support %d, which is within %g h = %s: that region is a deep beam, to be designed by 9.9 or chapter 23",
					l.load, beam.Short(e.system, from.Amount()), span+end, r.deepLoad, beam.Short(e.system, h.Scale(r.deepLoad).Amount())),
			})
		}
	}
	return out
}

// axialRefusals names axial compression that makes a column of a beam (9.5.2.2).
// Less of it, and tension, count in bending and in shear.
func (e *edition) axialRefusals(gross units.Area, c *beam.Concrete, axial units.Force, name string) []beam.Refusal {
	limit := c.Strength.MulArea(gross).Scale(e.scope.axial)
	if !(units.Force{}).Less(axial) || !limit.AtMost(axial) {
		return nil
	}
	return []beam.Refusal{{
		Rule: "scope.axial", Clause: "9.5.2.2",
		Detail: "axial compression of " + beam.Short(e.system, axial.Amount()) + named(name) + " is not below 0.10 f'c Ag = " + beam.Short(e.system, limit.Amount()) + ": 22.4 applies",
	}}
}

// named puts the name of a demand or combination after a value.
func named(name string) string {
	if name == "" {
		return ""
	}
	return " (" + name + ")"
}
