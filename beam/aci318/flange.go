package aci318

import (
	"math"

	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// Coefficients of 6.3.2, which all editions share: the flange beyond a face of
// the web works with it over no more than so many slab thicknesses, half of the
// clear distance to the next web, and a share of the clear span (Table 6.3.2.1).
const (
	interiorThicknesses, interiorShare = 8, 8  // slab on both sides: 8h, ℓn/8
	edgeThicknesses, edgeShare         = 6, 12 // slab on one side: 6h, ℓn/12

	isolatedThickness = 0.5 // of bw: least flange thickness of an isolated tee, 6.3.2.2(a)
	isolatedWidth     = 4   // of bw: its greatest width, 6.3.2.2(b)

	spreadShare = 10 // ℓn/10, within which tension steel of a flange is spread, 24.3.4
)

// overhang is the flange on one side of a web with a slab (Table 6.3.2.1).
type overhang struct {
	byThickness, byWeb, bySpan units.Length
	width                      units.Length // the least of the three
	governs                    string
}

// overhangOf is the overhang towards a web at a clear distance; interior says
// that there is a slab on both sides.
func overhangOf(interior bool, thickness, clear, span units.Length) overhang {
	times, part := edgeThicknesses, edgeShare
	words := [3]string{"6h", "half the clear distance to the next web, sw/2", "ℓn/12"}
	if interior {
		times, part = interiorThicknesses, interiorShare
		words[0], words[2] = "8h", "ℓn/8"
	}
	o := overhang{byThickness: thickness.Scale(float64(times)), byWeb: clear.Scale(0.5), bySpan: span.Scale(1 / float64(part))}
	o.width, o.governs = o.byThickness, words[0]
	if o.byWeb.Less(o.width) {
		o.width, o.governs = o.byWeb, words[1]
	}
	if o.bySpan.Less(o.width) {
		o.width, o.governs = o.bySpan, words[2]
	}
	return o
}

// flange finds how far a slab works with the web, or lists what a flange of
// given width takes for granted.
func (r *resolution) flange() {
	s := &r.b.Section
	switch {
	case s.Shape == beam.Polygon:
		r.confirm("section.outline", "the whole outline works together: a slab that is cast with the web is to be given as tee or ell, and no wider than 6.3.2 counts it",
			append([]string{"shear.strength", "torsion.threshold"}, flexureChecks...)...)
	case s.Flange() == 0:
	case !s.Slab.IsZero() && s.Flange() == beam.Top:
		r.slab()
	case s.Shape == beam.InvertedTee:
		r.confirm("flange.width", "the ledges run along the whole span, and work with the web over the "+r.length.Format(s.FlangeWidth)+" given",
			flexureChecks...)
	case s.Isolated:
		r.confirm("flange.width", "the tee stands alone: its flange ends where it is said to, and "+isolatedRule, append(flexureChecks, "flange.isolated")...)
	default:
		r.confirm("flange.width", "the flange width given, "+r.length.Format(s.FlangeWidth)+", is no more than the effective width of 6.3.2.1", flexureChecks...)
	}
	if s.Flange() != 0 || s.Shape == beam.Polygon {
		r.determinacy()
	}
}

const isolatedRule = "is held against 6.3.2.2"

// slab finds the overhangs of a tee or an ell from its slab. A beam of several
// spans has one flange, by the shortest clear span.
func (r *resolution) slab() {
	b := r.b
	s := &b.Section
	span, ok := shortestClearSpan(b)
	if !ok || !(s.FlangeThickness.In(units.Metre) > 0) {
		return // faults of the spans or the section say so
	}
	interior := !s.Slab.ClearLeft.IsZero() && !s.Slab.ClearRight.IsZero()
	said := ""
	side := func(name string, clear units.Length) units.Length {
		if clear.IsZero() {
			return units.Length{}
		}
		o := overhangOf(interior, s.FlangeThickness, clear, span)
		if said != "" {
			said += " and "
		}
		said += r.length.Format(o.width) + " on the " + name + " (" + o.governs + ")"
		return o.width
	}
	s.OverhangLeft, s.OverhangRight = side("left", s.Slab.ClearLeft), side("right", s.Slab.ClearRight)
	s.FlangeWidth = s.Width.Add(s.OverhangLeft).Add(s.OverhangRight)
	r.note.Assume(beam.Assumption{
		ID:      "flange.width",
		Assumed: "the flange works with the web over " + said + " (6.3.2.1)",
		UsedIn:  append([]string{"self-weight.section"}, flexureChecks...),
		Found:   "effective width " + r.length.Format(s.FlangeWidth) + ", from the slab and the shortest clear span, " + r.length.Format(span),
		Holds:   true,
	})
}

// shortestClearSpan is the least distance between the faces of neighbouring
// supports; ok is false where the brief has no sound spans.
func shortestClearSpan(b *beam.Brief) (least units.Length, ok bool) {
	if len(b.Spans) == 0 || len(b.Supports) != len(b.Spans)+1 {
		return least, false
	}
	p := beam.Problem{Brief: *b}
	for i := range b.Spans {
		if clear := p.ClearSpan(i + 1); i == 0 || clear.Less(least) {
			least = clear
		}
	}
	v := least.In(units.Metre)
	return least, v > 0 && !math.IsInf(v, 0)
}

// determinate reports whether statics alone gives the forces of a beam: as many
// reactions as there are equations. Demands do not tell, and are taken to be
// those of a determinate beam, for which 9.6.1.2 is the stricter.
func determinate(b *beam.Brief) bool {
	if len(b.Spans) == 0 {
		return true
	}
	reactions := 0
	for i := range b.Supports {
		switch b.Supports[i].Kind {
		case statics.Fixed:
			reactions += 2
		case statics.Pinned, statics.Roller:
			reactions++
		}
	}
	return reactions <= 2
}

// determinacy lists what least steel with the flange in tension goes by.
func (r *resolution) determinacy() {
	a := beam.Assumption{ID: "flexure.determinate", UsedIn: []string{"flexure.minimum.positive", "flexure.minimum.negative"}, Holds: true}
	const strict = ": where the flange is in tension, least steel goes by the lesser of bf and 2bw (9.6.1.2)"
	switch {
	case len(r.b.Spans) == 0:
		a.Assumed, a.Open, a.Holds = "the beam that the demands come from is statically determinate, the stricter of the two"+strict, true, false
	case determinate(r.b):
		a.Assumed, a.Found = "the beam is statically determinate"+strict, "statics alone gives its reactions"
	default:
		a.Assumed, a.Found = "the beam is statically indeterminate: least steel goes by bw whichever face is in tension (9.6.1.2)", "it has more reactions than statics alone gives"
	}
	r.note.Assume(a)
}

// flangeSpread is the lesser of the effective flange width and ℓn/10 (24.3.4).
func flangeSpread(p *beam.Problem, f beam.Face) units.Length {
	if f == 0 || f != p.Brief.Section.Flange() {
		return units.Length{}
	}
	width := p.Geometry.FaceWidth(f)
	for span := 1; span <= p.Forces.Spans(); span++ {
		width = width.Min(p.ClearSpan(span).Scale(1.0 / spreadShare))
	}
	return width
}

// isolatedCheck is the worse of the two limits of 6.3.2.2.
func isolatedCheck(s *beam.Section) beam.Check {
	thin := beam.Check{ID: "flange.isolated", Clause: "6.3.2.2(a)", Reason: "least thickness of the flange of an isolated tee, and its thickness"}
	thin.Compare(s.Width.Scale(isolatedThickness).Amount(), s.FlangeThickness.Amount())
	wide := beam.Check{ID: "flange.isolated", Clause: "6.3.2.2(b)", Reason: "width of the flange of an isolated tee, and the greatest"}
	if wide.Compare(s.FlangeWidth.Amount(), s.Width.Scale(isolatedWidth).Amount()); thin.Utilization < wide.Utilization {
		return wide
	}
	return thin
}

// appendFlange appends what the standard asks of a flange as such.
func (e *edition) appendFlange(dst []beam.Check, t *beam.Trial) []beam.Check {
	s := &t.Brief.Section
	if s.Isolated {
		dst = append(dst, isolatedCheck(s))
	}
	if s.Shape == beam.Polygon && !t.Geometry.Overall.AtMost(s.Width) {
		return append(dst, notJudgedOutline)
	}
	switch s.Flange() {
	case beam.Top:
		return append(dst, notJudgedTransverse)
	case beam.Bottom:
		return append(dst, notJudgedLedges)
	}
	return dst
}

var notJudgedTransverse = beam.NotJudgedCheck("flange.transverse", "9.2.4.3, 7.5.2.3",
	"slab steel across the web, which carries the overhanging flange as a cantilever, is not part of the input")

var notJudgedOutline = beam.NotJudgedCheck("flange.transverse", "9.2.4.3, 7.5.2.3, 24.3.4",
	"the outline is wider than the strip of its stirrups: slab steel across that strip, and the spread of tension steel beside it, are asked of flanges, which an outline does not tell; give a slab as tee or ell")

var notJudgedLedges = beam.NotJudgedCheck("ledge.design", "16.5",
	"the ledges under their own loads (bending, shear friction, punching and bearing, and the stirrups that lift them) are not judged by this version")
