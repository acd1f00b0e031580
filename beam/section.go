package beam

import (
	"slices"

	"soffit.example/units"
)

// Section is the beam's concrete outline. Width is that of the web: the
// upright strip between the sides of the form in which the stirrups stand,
// over the whole depth. Of a rectangle it is the overall width.
//
// A polygon is given by its Outline alone; Width and Depth follow from it, the
// strip being the widest that the outline holds from top to bottom.
type Section struct {
	Shape Shape
	Width units.Length
	Depth units.Length // overall

	// Flange of a tee or an ell, at the top; ledges of an inverted tee, at the
	// bottom.
	FlangeThickness units.Length
	// FlangeWidth is the flange's overall width, web included, as far as it
	// works with the web: by default half of the rest on each side, of an ell
	// all of it on the right. Zero with a Slab, from which the code finds it.
	FlangeWidth units.Length
	Slab        Slab
	// OverhangLeft and OverhangRight are the flange beside the web, as
	// resolved; what a brief says of them is not read.
	OverhangLeft, OverhangRight units.Length

	Isolated bool // a tee of its own, whose flange only gives it compression area
	Joist    bool // a rib of a one-way joist floor

	Outline []Point   // of a polygon: its corners in order, either way round
	Voids   [][]Point // hollows inside the outline
}

// Slab is the floor that a tee or an ell is cast with: the clear distance to
// the next web on each side. Zero on one side: no slab there, as at the edge
// of a floor.
type Slab struct{ ClearLeft, ClearRight units.Length }

// IsZero reports whether no slab is given.
func (s Slab) IsZero() bool { return s == Slab{} }

// Point is a corner of an outline: X to the right and Y upward from any origin
// that the outline keeps to.
type Point struct{ X, Y units.Length }

// Flange is the face of the section at which its flange or its ledges lie;
// zero where it has none.
func (s *Section) Flange() Face {
	switch s.Shape {
	case Tee, Ell:
		return Top
	case InvertedTee:
		return Bottom
	}
	return 0
}

// Overhangs are the widths of the flange on each side of the web; zero without
// a flange at the face.
func (s *Section) Overhangs(f Face) (left, right units.Length) {
	if f == 0 || f != s.Flange() {
		return left, right
	}
	return s.OverhangLeft, s.OverhangRight
}

// spread fills the overhangs of a flange whose width is given.
func (s *Section) spread() {
	rest := s.FlangeWidth.Sub(s.Width)
	if s.Flange() == 0 || s.FlangeWidth.IsZero() || !s.Slab.IsZero() {
		return
	}
	s.OverhangLeft, s.OverhangRight = rest.Scale(0.5), rest.Scale(0.5)
	if s.Shape == Ell {
		s.OverhangLeft, s.OverhangRight = units.Length{}, rest
	}
}

// clone copies a section's own slices.
func (s Section) clone() Section {
	s.Outline = slices.Clone(s.Outline)
	voids := make([][]Point, len(s.Voids))
	for i, v := range s.Voids {
		voids[i] = slices.Clone(v)
	}
	if s.Voids != nil {
		s.Voids = voids
	}
	return s
}

// bare is a resolved section as a query gives it.
func (s Section) bare() Section {
	if s.Shape == Polygon {
		s.Width, s.Depth = units.Length{}, units.Length{}
	}
	s.Slab = Slab{}
	return s
}

// MeasureSection measures a section that is given by itself, without a beam, and
// reports its faults, with values in the units of a system. It fills the
// overhangs of a flange, and the width and depth of a polygon.
func MeasureSection(system units.System, s *Section) (Geometry, []Fault) {
	f := newFaults(system)
	if s.check(&f, false); len(f.list) > 0 {
		return Geometry{}, f.list
	}
	return GeometryOf(s)
}

// check reports the faults of a section that no code is needed to see. Those of
// a polygon's corners are seen to when it is measured.
func (s *Section) check(f *faults, member bool) {
	within := func(field, what string, v units.Length) bool {
		return f.within("/section/"+field, what, v.Amount(), f.leastSide.Amount(), f.mostSide.Amount())
	}
	absent := func(field string, given bool, of string) {
		if given {
			f.add("/section/"+field, "", "%s is no part of %s", field, of)
		}
	}
	f.word("/section/shape", "shape", s.Shape.String(), false, shapeWords)
	a := "a " + s.Shape.String() + " section"
	absent("outline", s.Shape != Polygon && len(s.Outline) > 0, a)
	absent("voids", s.Shape != Polygon && len(s.Voids) > 0, a)
	flanged := s.Flange() != 0
	absent("flange_thickness", !flanged && !s.FlangeThickness.IsZero(), a)
	absent("flange_width", !flanged && !s.FlangeWidth.IsZero(), a)
	absent("slab", s.Flange() != Top && !s.Slab.IsZero(), a)
	absent("isolated", s.Shape != Tee && s.Isolated, a)
	absent("joist", s.Flange() != Top && s.Joist, a)
	if s.Shape == 0 {
		return
	}
	if s.Shape == Polygon {
		absent("width", !s.Width.IsZero(), "a polygon, whose outline says it")
		absent("depth", !s.Depth.IsZero(), "a polygon, whose outline says it")
		return
	}
	field := "width"
	if flanged {
		field = "web_width"
	}
	sound := within(field, "width", s.Width)
	deep := within("depth", "depth", s.Depth)
	if !flanged {
		return
	}
	if within("flange_thickness", "flange thickness", s.FlangeThickness) && deep && !s.FlangeThickness.Add(f.leastWeb).AtMost(s.Depth) {
		f.add("/section/flange_thickness", "less than the depth by "+f.system.Format(f.leastWeb.Amount()), "flange thickness is %s", f.system.Format(s.FlangeThickness.Amount()))
	}
	switch {
	case !s.FlangeWidth.IsZero() && !s.Slab.IsZero() && s.OverhangLeft.Add(s.OverhangRight).IsZero():
		f.add("/section/slab", "", "a flange has either a width or a slab, not both")
	case !s.FlangeWidth.IsZero() && s.Slab.IsZero():
		if within("flange_width", "flange width", s.FlangeWidth) && sound && !s.Width.AtMost(s.FlangeWidth) {
			f.add("/section/flange_width", "no less than the web, "+f.system.Format(s.Width.Amount()), "flange width is %s", f.system.Format(s.FlangeWidth.Amount()))
		}
	case s.Slab.IsZero():
		f.add("/section/flange_width", f.system.Format(f.leastSide.Amount())+" to "+f.system.Format(f.mostSide.Amount()), "neither the width of the flange nor the slab is given")
	case s.Isolated:
		f.add("/section/isolated", "", "a tee of its own has a flange width, and a slab is given")
	default:
		s.Slab.check(f, s.Shape, member)
	}
}

// check reports the faults of a slab.
func (s Slab) check(f *faults, shape Shape, member bool) {
	sides := [2]units.Length{s.ClearLeft, s.ClearRight}
	for i, name := range [2]string{"clear_left", "clear_right"} {
		f.within("/section/slab/"+name, "clear distance to the next web", sides[i].Amount(), units.Length{}.Amount(), f.mostSpan.Amount())
	}
	switch one := s.ClearLeft.IsZero() != s.ClearRight.IsZero(); {
	case shape == Tee && one:
		f.add("/section/slab", "a slab on both sides, or an ell", "a tee has a slab on one side only")
	case shape == Ell && !one:
		f.add("/section/slab", "a slab on one side, or a tee", "an ell has a slab on both sides")
	}
	if !member {
		f.add("/section/slab", "a flange_width", "the width that works with the web follows from the clear span, and demands have none")
	}
}
