package service

import (
	"soffit.example/beam"
	"soffit.example/service/internal/wire"
)

// sectionRules are the rules of sections by shape, but for the width of a
// flange, which is said in one of two ways. A shape that is not known has a
// fault of its own.
var sectionRules = [...]rule{
	0:                {may: "width web_width depth flange_thickness flange_width slab isolated outline voids"},
	beam.Rectangular: {needs: "width depth"},
	beam.Tee:         {needs: "web_width depth flange_thickness", may: "flange_width slab isolated"},
	beam.Ell:         {needs: "web_width depth flange_thickness", may: "flange_width slab"},
	beam.InvertedTee: {needs: "web_width depth flange_thickness flange_width"},
	beam.Polygon:     {needs: "outline", may: "voids"},
}

func (in *intake) section(w *wire.Section, at string) beam.Section {
	s := beam.Section{
		Shape: word[beam.Shape](&w.Shape), Width: value(w.Width), Depth: value(w.Depth),
		FlangeThickness: value(w.FlangeThickness), FlangeWidth: above(in, at+"/flange_width", w.FlangeWidth),
		Isolated: value(w.Isolated), Joist: value(w.Joist),
		Outline: points(w.Outline),
	}
	if w.WebWidth != nil {
		s.Width = *w.WebWidth
	}
	if w.Slab != nil {
		s.Slab = in.slab(w.Slab, at+"/slab")
	}
	for _, v := range w.Voids {
		s.Voids = append(s.Voids, points(v))
	}
	thing := "a " + w.Shape
	if s.Shape == beam.Ell || s.Shape == beam.InvertedTee {
		thing = "an " + w.Shape
	}
	in.belong(at, thing+" section", sectionRules[s.Shape], []member{
		{"width", aSize, w.Width != nil},
		{"web_width", aSize, w.WebWidth != nil},
		{"depth", aSize, w.Depth != nil},
		{"flange_thickness", aSize, w.FlangeThickness != nil},
		{"flange_width", aSize, w.FlangeWidth != nil},
		{"slab", "", w.Slab != nil},
		{"isolated", "", w.Isolated != nil},
		{"outline", `a list of corners, e.g. {"x": "0 in", "y": "24 in"}`, w.Outline != nil},
		{"voids", "", w.Voids != nil},
	})
	if s.Shape == beam.Tee || s.Shape == beam.Ell {
		in.flange(w, at)
	}
	return s
}

// flange notes a flange whose width is given in both ways or in none.
func (in *intake) flange(w *wire.Section, at string) {
	switch {
	case w.FlangeWidth == nil && w.Slab == nil:
		in.fault(at+"/flange_width", aSize+"; or a slab", "is missing, and no slab is given in its place")
	case w.FlangeWidth != nil && w.Slab != nil:
		in.fault(at+"/slab", "", "is given beside flange_width; a flange has the one or the other")
	}
}

func (in *intake) slab(w *wire.Slab, at string) beam.Slab {
	if w.ClearLeft == nil && w.ClearRight == nil {
		in.fault(at, "at least one of clear_left, clear_right", "has no side")
	}
	return beam.Slab{ClearLeft: above(in, at+"/clear_left", w.ClearLeft), ClearRight: above(in, at+"/clear_right", w.ClearRight)}
}

func points(w []wire.Point) []beam.Point {
	if w == nil {
		return nil
	}
	out := make([]beam.Point, len(w))
	for i, p := range w {
		out[i] = beam.Point(p)
	}
	return out
}

// section writes a section as it was designed with. The geometry is
// missing where the flange was not resolved.
func (o *outlet) section(s *beam.Section, g *beam.Geometry) *wire.SectionReply {
	w := &wire.SectionReply{
		Shape: s.Shape.String(), Depth: express(o, s.Depth),
		FlangeThickness: optional(o, s.FlangeThickness), FlangeWidth: optional(o, s.FlangeWidth),
		OverhangLeft: optional(o, s.OverhangLeft), OverhangRight: optional(o, s.OverhangRight),
	}
	if s.Shape == beam.Rectangular {
		w.Width = optional(o, s.Width)
	} else {
		w.WebWidth = optional(o, s.Width)
	}
	if g.Gross.IsZero() {
		return w
	}
	w.Measured = &wire.Measured{
		Gross: express(o, g.Gross), Enclosed: express(o, g.Enclosed), Perimeter: express(o, g.Perimeter),
		Least: express(o, g.Web), Overall: express(o, g.Overall), TopWidth: express(o, g.TopWidth), BottomWidth: express(o, g.BottomWidth),
	}
	if g.Hollow {
		w.Measured.Walls = &wire.Walls{Side: express(o, g.SideWall), Top: express(o, g.TopWall), Bottom: express(o, g.BottomWall)}
	}
	return w
}
