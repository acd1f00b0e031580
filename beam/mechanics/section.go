package mechanics

import (
	"fmt"
	"math"

	"soffit.example/units"
)

// A Part is a rectangle or a trapezoid of concrete, its edges measured from the
// top face of the section.
type Part struct {
	Top, Bottom units.Length
	Width       units.Length // at the top edge
	BottomWidth units.Length // at the bottom edge, with straight sides between; zero: as at the top
}

// Widths returns the width at the top edge and at the bottom edge.
func (p Part) Widths() (top, bottom units.Length) {
	if p.BottomWidth.IsZero() {
		return p.Width, p.Width
	}
	return p.Width, p.BottomWidth
}

// widths returns both widths in m.
func (p *Part) widths() (top, bottom float64) {
	top = p.Width.In(units.Metre)
	if p.BottomWidth.IsZero() {
		return top, top
	}
	return top, p.BottomWidth.In(units.Metre)
}

// Steel is an elastic, perfectly plastic steel, the same in tension and in
// compression. A reading that rounds the yield strain is a modulus of
// Yield over that strain.
type Steel struct {
	Modulus, Yield units.Stress
}

// YieldStrain returns the strain at which the steel yields.
func (s Steel) YieldStrain() float64 { return s.Yield.Ratio(s.Modulus) }

// Stress returns the stress at a strain, signed as the strain.
func (s Steel) Stress(strain float64) units.Stress {
	return s.Modulus.Scale(strain).Min(s.Yield).Max(s.Yield.Neg())
}

// A Layer is the steel at one depth, measured from the top face of the section.
type Layer struct {
	Depth units.Length
	Area  units.Area
	Steel Steel
}

// A Section is a stack of rectangles and trapezoids with no gap between them,
// listed from the top face down, and layers of steel in any order. The first part
// starts at the top face. Only widths count, so that webs side by side are one
// part of their summed width: see [Box].
type Section struct {
	Parts  []Part
	Layers []Layer
}

// Rectangle returns the one part of a rectangular section.
func Rectangle(width, depth units.Length) []Part {
	return []Part{{Bottom: depth, Width: width}}
}

// Tee returns the parts of a section with its flange at the top.
func Tee(flangeWidth, flangeThickness, webWidth, depth units.Length) []Part {
	return []Part{
		{Bottom: flangeThickness, Width: flangeWidth},
		{Top: flangeThickness, Bottom: depth, Width: webWidth},
	}
}

// InvertedTee returns the parts of a section with its flange at the bottom.
func InvertedTee(flangeWidth, flangeThickness, webWidth, depth units.Length) []Part {
	web := depth.Sub(flangeThickness)
	return []Part{
		{Bottom: web, Width: webWidth},
		{Top: web, Bottom: depth, Width: flangeWidth},
	}
}

// Trapezoid returns the one part of a section with straight sloping sides.
func Trapezoid(topWidth, bottomWidth, depth units.Length) []Part {
	return []Part{{Bottom: depth, Width: topWidth, BottomWidth: bottomWidth}}
}

// Box returns the parts of a hollow section. webWidth is the sum of the widths of
// its webs.
func Box(width, depth, topThickness, bottomThickness, webWidth units.Length) []Part {
	floor := depth.Sub(bottomThickness)
	return []Part{
		{Bottom: topThickness, Width: width},
		{Top: topThickness, Bottom: floor, Width: webWidth},
		{Top: floor, Bottom: depth, Width: width},
	}
}

// Depth returns the distance between the faces of the section, zero where it has
// no part.
func (s Section) Depth() units.Length {
	if len(s.Parts) == 0 {
		return units.Length{}
	}
	return s.Parts[len(s.Parts)-1].Bottom
}

// Sizes that a section may have. They are no rule for beams: they keep the
// arithmetic finite.
const (
	leastLength = 1e-4  // m
	mostLength  = 1e4   // m
	leastArea   = 1e-12 // m²
	mostArea    = 1e8   // m²
)

// Validate reports the first fault of the section as an [*InputError].
func (s Section) Validate() error {
	if err := s.validateParts(); err != nil {
		return err
	}
	depth := s.Depth()
	for i := range s.Layers {
		l := &s.Layers[i]
		d, a := l.Depth.In(units.Metre), l.Area.In(units.SquareMetre)
		yield := l.Steel.YieldStrain()
		switch {
		case !(d >= 0 && l.Depth.AtMost(depth)):
			return fault("layers", i, "depth", l.Depth, "from 0 to the depth of the section, "+depth.String())
		case !(a >= leastArea && a <= mostArea):
			return fault("layers", i, "area", l.Area, "from 1e-6 mm2 to 1e8 m2")
		case !stressInRange(l.Steel.Modulus):
			return fault("layers", i, "steel.modulus", l.Steel.Modulus, stressRange)
		case !stressInRange(l.Steel.Yield):
			return fault("layers", i, "steel.yield", l.Steel.Yield, stressRange)
		case !(yield >= 1e-9 && yield <= 1):
			return fault("layers", i, "steel.yield", l.Steel.Yield, "from 1e-9 to 1 times its modulus, "+l.Steel.Modulus.String())
		}
	}
	return nil
}

func (s Section) validateParts() error {
	if len(s.Parts) == 0 {
		return &InputError{Field: "parts", Value: "none", Allowed: "at least one rectangle"}
	}
	face := units.Length{}
	for i := range s.Parts {
		p := &s.Parts[i]
		top, bottom, above := p.Top.In(units.Metre), p.Bottom.In(units.Metre), face.In(units.Metre)
		width, below := p.widths()
		switch {
		case !joins(top, above):
			return fault("parts", i, "top", p.Top, "where the part above it ends, "+face.String())
		case !(bottom-above >= leastLength && bottom <= mostLength):
			return fault("parts", i, "bottom", p.Bottom, "at least 0.1 mm below its top, "+face.String()+", and at most 10 km")
		case !(width >= leastLength && width <= mostLength):
			return fault("parts", i, "width", p.Width, "from 0.1 mm to 10 km")
		case !(below >= leastLength && below <= mostLength):
			return fault("parts", i, "bottomWidth", p.BottomWidth, "from 0.1 mm to 10 km, or zero for the width at the top")
		}
		face = p.Bottom
	}
	return nil
}

// fault names a field of an element of a list.
func fault(list string, i int, field string, value fmt.Stringer, allowed string) error {
	return &InputError{Field: fmt.Sprintf("%s[%d].%s", list, i, field), Value: value.String(), Allowed: allowed}
}

// joins reports whether two faces in m are the same face: a depth summed another
// way, or one that came by another unit, differs in its last bits.
func joins(a, b float64) bool { return math.Abs(a-b) <= 1e-9*(math.Abs(a)+math.Abs(b)) }

// A Sense of bending says which face is in compression.
type Sense uint8

const (
	Sagging Sense = iota // compression at the top face
	Hogging              // compression at the bottom face
)

// String returns "sagging" or "hogging".
func (s Sense) String() string {
	switch s {
	case Sagging:
		return "sagging"
	case Hogging:
		return "hogging"
	}
	return fmt.Sprintf("Sense(%d)", uint8(s))
}
