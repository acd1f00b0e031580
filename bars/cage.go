package bars

import (
	"math"

	"soffit.example/units"
)

// Corner says where the outermost bars of the layer nearest the face lie.
type Corner uint8

const (
	// Seated bars rest on the stirrup's horizontal leg. Their centres cannot
	// pass the tangent point of the bend.
	Seated Corner = iota
	// Tucked bars are pushed into the bend until they touch it on its
	// diagonal: nearer the side, a little further from the face. A bar that
	// is wider than the bend fits against both legs instead.
	Tucked
)

func (c Corner) String() string {
	switch c {
	case Seated:
		return "seated"
	case Tucked:
		return "tucked"
	}
	return "unknown corner"
}

// Cage is a stirrup in a rectangular form.
type Cage struct {
	Width units.Length // of the form
	Depth units.Length // of the form; zero leaves it unchecked
	// SideCover and FaceCover are clear covers to the stirrup, or to the bars
	// if there is no stirrup: at both sides, and at the face at which the
	// bars lie (and at the opposite one).
	SideCover, FaceCover units.Length
	Stirrup              Size         // zero: none
	BendRadius           units.Length // inside radius of the stirrup's bends; zero: its catalog's rule
	Corner               Corner
}

// Clearance is a required clear distance between two bars: Least, but at
// least Diameters times the larger of the two.
type Clearance struct {
	Least     units.Length
	Diameters float64
}

// Clearances are the clear distances that a design code requires between
// neighbours of a layer and between bars of successive layers.
type Clearances struct {
	InLayer, BetweenLayers Clearance
}

// Guards against absurd input; no rule of construction.
const (
	maxWidth     = 100  // m
	maxCover     = 10   // m
	maxClearance = 10   // m
	maxMultiple  = 100  // bar diameters
	MaxBars      = 1000 // most bars in a fit
)

// Outside is the stirrup out to out: the form less the covers. The depth is
// zero if the cage has none.
func (c *Cage) Outside() (width, depth units.Length) {
	width = c.Width.Sub(c.SideCover.Scale(2))
	if !c.Depth.IsZero() {
		depth = c.Depth.Sub(c.FaceCover.Scale(2))
	}
	return width, depth
}

// form is a cage in metres.
type form struct {
	width    float64
	top      float64 // from the face to the inner face of the opposite leg; +Inf if unchecked
	side     float64 // from the side face to the inner face of the side leg
	base     float64 // from the face to the inner face of the horizontal leg
	radius   float64 // inside, of the bends; 0 without a stirrup
	tucked   bool
	clear    gap // between neighbours of a layer
	vertical gap // between layers
}

// gap is a Clearance in metres.
type gap struct{ least, diameters float64 }

// between is the clear distance required between bars that count with radii
// a and b.
func (g gap) between(a, b float64) float64 {
	return max(g.least, g.diameters*2*max(a, b))
}

func (c *Cage) form(need Clearances) (form, error) {
	f := form{
		width:    c.Width.In(units.Metre),
		top:      math.Inf(1),
		side:     c.SideCover.In(units.Metre),
		base:     c.FaceCover.In(units.Metre),
		tucked:   c.Corner == Tucked,
		clear:    gap{need.InLayer.Least.In(units.Metre), need.InLayer.Diameters},
		vertical: gap{need.BetweenLayers.Least.In(units.Metre), need.BetweenLayers.Diameters},
	}
	switch {
	case !(f.width > 0 && f.width <= maxWidth):
		return f, outside("width", c.Width, "more than 0 m, at most 100 m")
	case !(f.side >= 0 && f.side <= maxCover):
		return f, outside("side cover", c.SideCover, "0 m to 10 m")
	case !(f.base >= 0 && f.base <= maxCover):
		return f, outside("face cover", c.FaceCover, "0 m to 10 m")
	case c.Corner > Tucked:
		return f, &RangeError{Field: "corner", Value: c.Corner.String(), Allowed: "seated or tucked"}
	}
	for _, g := range [...]struct {
		name string
		gap  Clearance
	}{{"clearance in a layer", need.InLayer}, {"clearance between layers", need.BetweenLayers}} {
		if v := g.gap.Least.In(units.Metre); !(v >= 0 && v <= maxClearance) {
			return f, outside(g.name, g.gap.Least, "0 m to 10 m")
		}
		if v := g.gap.Diameters; !(v >= 0 && v <= maxMultiple) {
			return f, &RangeError{Field: g.name, Value: formatFactor(v) + " diameters", Allowed: "0 to 100 diameters"}
		}
	}
	if err := c.stirrup(&f); err != nil {
		return f, err
	}
	if !c.Depth.IsZero() {
		depth := c.Depth.In(units.Metre)
		if !(depth > 0 && depth <= maxWidth) {
			return f, outside("depth", c.Depth, "more than 0 m, at most 100 m; or zero for unchecked")
		}
		f.top = depth - f.base
	}
	return f, nil
}

// stirrup adds the stirrup's bar and bend to the form.
func (c *Cage) stirrup(f *form) error {
	radius := c.BendRadius.In(units.Metre)
	if !(radius >= 0 && radius <= maxWidth) {
		return outside("bend radius", c.BendRadius, "0 m to 100 m")
	}
	if c.Stirrup.IsZero() {
		if radius != 0 {
			return &RangeError{Field: "bend radius", Value: c.BendRadius.String(), Allowed: "zero without a stirrup"}
		}
		return nil
	}
	if c.Stirrup.Bundled() > 1 {
		return &RangeError{Field: "stirrup", Value: c.Stirrup.Name, Allowed: "a single bar"}
	}
	d := c.Stirrup.Diameter.In(units.Metre)
	if !(d > 0 && d <= maxDiameter) {
		return outside("stirrup diameter", c.Stirrup.Diameter, "more than 0 m, at most 1 m")
	}
	if radius == 0 {
		b, err := c.Stirrup.Bend(Stirrup)
		if err != nil {
			return err
		}
		radius = b.Inside.In(units.Metre) / 2
	}
	f.side += d
	f.base += d
	f.radius = radius
	return nil
}

func outside(field string, v units.Length, allowed string) error {
	return &RangeError{Field: field, Value: v.String(), Allowed: allowed}
}

// seat is the horizontal distance from the side leg's inner face to the
// centre of a seated body: its outer bar stands at the tangent point of the
// bend, or at the leg itself if it is wider than the bend.
func (f *form) seat(b *body) float64 { return b.wide + max(f.radius, b.bar) }

// tuck is the same for a tucked body.
func (f *form) tuck(b *body) float64 { return b.wide + f.nook(b.bar) }

// nook is the distance of a tucked bar's centre from the inner faces of both
// legs.
func (f *form) nook(r float64) float64 {
	if r >= f.radius {
		return r
	}
	return f.radius - (f.radius-r)/math.Sqrt2
}

// wall is the distance of a bar of radius r from the inner face of the side
// leg when it touches the leg or, below the tangent point, the bend; y is the
// height of its centre over the horizontal leg's inner face.
func (f *form) wall(r, y float64) float64 {
	if r >= f.radius || y >= f.radius {
		return r
	}
	rise := (f.radius - r) * (f.radius - r)
	rise -= (f.radius - y) * (f.radius - y)
	return f.radius - math.Sqrt(max(0, rise))
}

// corner is where a body in the corner lies: from the inner face of the side
// leg, and how far it is raised off the horizontal leg.
func (f *form) corner(b *body) (x, raised float64) {
	if f.tucked {
		return f.tuck(b), f.nook(b.bar) - b.bar
	}
	return f.seat(b), 0
}

// pitch is the least horizontal distance between the centres of neighbours a
// and b, of which b lies to the right and dy higher. No bar of one may pass
// over the centre of a bar of the other.
func (f *form) pitch(a, b *body, dy float64) float64 {
	centres := a.bar + b.bar + f.clear.between(a.counts, b.counts)
	if a.n == 1 && b.n == 1 {
		return run(centres, dy)
	}
	least := a.wide + b.wide
	for i := range a.n {
		xi, yi := a.at(i)
		for j := range b.n {
			xj, yj := b.at(j)
			least = max(least, run(centres, dy+yj-yi)-(xj-xi))
		}
	}
	return least
}

// run is the horizontal part of a distance whose vertical part is rise; zero
// if that is all of it.
func run(distance, rise float64) float64 {
	if distance <= math.Abs(rise) {
		return 0
	}
	return math.Sqrt((distance - rise) * (distance + rise))
}

// rowWidth is the least width of the form for n bodies in the layer nearest
// the face.
func (f *form) rowWidth(n int, b *body) float64 {
	least := 2 * (f.side + f.seat(b))
	if n == 1 {
		return least
	}
	x, raised := f.corner(b)
	across := f.pitch(b, b, 0)
	if n > 2 {
		// The bars beside the corners rest on the leg, past the tangent point.
		end := max(f.pitch(b, b, -raised), f.seat(b)-x)
		across = 2*end + float64(n-3)*f.pitch(b, b, 0)
	}
	return max(2*(f.side+f.radius), 2*(f.side+x)+across)
}

// MostInLayer is the largest number of bars or bundles of size s that fit in
// the layer nearest the face, with the corner ones as c.Corner says; 0 if not
// even one fits, at most [MaxBars]. Errors are those of [Cage.Fit].
func (c *Cage) MostInLayer(s Size, need Clearance) (int, error) {
	f, err := c.form(Clearances{InLayer: need})
	if err != nil {
		return 0, err
	}
	if err := s.Check(); err != nil {
		return 0, err
	}
	b := s.body()
	n := 0
	for step := MaxBars; step > 0; {
		// rowWidth grows with n: feel the way up in halving steps.
		if n+step <= MaxBars && units.AtMost(f.rowWidth(n+step, &b), f.width) {
			n += step
		} else {
			step /= 2
		}
	}
	return n, nil
}

// LeastWidth is the least width of a form for one layer of n bars or bundles
// of size s nearest the face, with the covers, stirrup and corners of c; its
// own width does not matter, but must be valid. The count is 1 to [MaxBars].
func (c *Cage) LeastWidth(s Size, n int, need Clearance) (units.Length, error) {
	f, err := c.form(Clearances{InLayer: need})
	if err != nil {
		return units.Length{}, err
	}
	if err := s.Check(); err != nil {
		return units.Length{}, err
	}
	if n < 1 || n > MaxBars {
		return units.Length{}, countError("count", n)
	}
	b := s.body()
	return units.Metre.Of(f.rowWidth(n, &b)), nil
}
