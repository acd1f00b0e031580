package beam

import (
	"cmp"
	"fmt"
	"math"
	"slices"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// Geometry is what a section measures, worked out once. Lengths across are
// from the left end of the whole section.
type Geometry struct {
	Parts []mechanics.Part // from the top face down, net of hollows

	Gross     units.Area   // of the concrete, net of hollows
	Enclosed  units.Area   // inside the outside perimeter, hollows included
	Perimeter units.Length // outside
	Form      units.Length // of the perimeter, what is not the top face

	Web     units.Length // least width of concrete at any level, net of hollows
	WebLeft units.Length // from the left end to the strip of Section.Width
	Overall units.Length // between the ends
	// OverhangThickness is how thick the outline is just outside the left and
	// the right side of the strip; zero where nothing is there.
	OverhangThickness [2]units.Length
	TopWidth          units.Length // of the faces
	BottomWidth       units.Length

	// Of a section with hollows: the least concrete between a hollow and the
	// outside of the strip in which the stirrups stand.
	Hollow                        bool
	Hollows                       [][2]units.Length // their left and right ends, from the left side of the strip
	SideWall, TopWall, BottomWall units.Length
}

// FaceWidth is the width of the top or bottom face.
func (g *Geometry) FaceWidth(f Face) units.Length {
	if f == Top {
		return g.TopWidth
	}
	return g.BottomWidth
}

// GeometryOf measures a section whose flange is resolved. Of a polygon it also
// gives the section its Width and Depth. Faults have paths under /section.
func GeometryOf(s *Section) (Geometry, []Fault) {
	s.spread()
	if s.Shape == Polygon {
		return s.polygon()
	}
	return s.flanged(), nil
}

// flanged measures a rectangle, with the flange if it has one.
func (s *Section) flanged() Geometry {
	left, right := s.Overhangs(s.Flange())
	over := left.Add(right)
	g := Geometry{
		Gross: s.Width.MulLength(s.Depth), Web: s.Width, WebLeft: left, Overall: s.Width.Add(over),
		Perimeter: s.Width.Add(s.Depth).Add(over).Scale(2),
		TopWidth:  s.Width, BottomWidth: s.Width,
	}
	t := s.FlangeThickness
	for i, o := range [2]units.Length{left, right} {
		if !o.IsZero() {
			g.OverhangThickness[i] = t
		}
	}
	switch {
	case s.Flange() == 0 || over.IsZero():
		g.Parts = mechanics.Rectangle(s.Width, s.Depth)
	case s.Flange() == Top:
		g.Parts, g.TopWidth = mechanics.Tee(g.Overall, t, s.Width, s.Depth), g.Overall
	default:
		g.Parts, g.BottomWidth = mechanics.InvertedTee(g.Overall, t, s.Width, s.Depth), g.Overall
	}
	if !over.IsZero() {
		g.Gross = g.Gross.Add(over.MulLength(t))
	}
	g.Enclosed = g.Gross
	g.Form = g.Perimeter.Sub(g.TopWidth)
	return g
}

// mostCorners bounds the outline of a polygon.
const mostCorners = 200

// corner is a point in metres.
type corner struct{ x, y float64 }

// ring is a closed line of corners, counter-clockwise.
type ring []corner

func ringOf(points []Point) ring {
	r := make(ring, len(points))
	for i, p := range points {
		r[i] = corner{p.X.In(units.Metre), p.Y.In(units.Metre)}
	}
	if r.area() < 0 {
		slices.Reverse(r)
	}
	return r
}

// area is positive counter-clockwise.
func (r ring) area() (sum float64) {
	for i, a := range r {
		b := r[(i+1)%len(r)]
		sum += a.x*b.y - b.x*a.y
	}
	return sum / 2
}

func (r ring) perimeter() (sum float64) {
	for i, a := range r {
		b := r[(i+1)%len(r)]
		sum += math.Hypot(b.x-a.x, b.y-a.y)
	}
	return sum
}

// crosses reports whether two of the edges of the rings meet, but for
// neighbours in their common corner.
func crosses(a, b ring) bool {
	same := &a[0] == &b[0]
	for i := range a {
		for j := range b {
			if same && (j == i || j == (i+1)%len(a) || i == (j+1)%len(a)) {
				continue
			}
			if segmentsMeet(a[i], a[(i+1)%len(a)], b[j], b[(j+1)%len(b)]) {
				return true
			}
		}
	}
	return false
}

// side is on which side of the line from a to b a point lies.
func side(a, b, p corner) float64 { return (b.x-a.x)*(p.y-a.y) - (b.y-a.y)*(p.x-a.x) }

func segmentsMeet(a, b, c, d corner) bool {
	s1, s2, s3, s4 := side(a, b, c), side(a, b, d), side(c, d, a), side(c, d, b)
	if s1*s2 < 0 && s3*s4 < 0 {
		return true
	}
	on := func(p, q, r corner, s float64) bool { // r on the segment from p to q
		return s == 0 && min(p.x, q.x) <= r.x && r.x <= max(p.x, q.x) && min(p.y, q.y) <= r.y && r.y <= max(p.y, q.y)
	}
	return on(a, b, c, s1) || on(a, b, d, s2) || on(c, d, a, s3) || on(c, d, b, s4)
}

// chord is where the ring is cut at a level strictly between its corners'
// levels, from left to right, with the edges that are cut.
type cut struct {
	x    float64
	edge int
}

func (r ring) cuts(y float64) []cut {
	var out []cut
	for i, a := range r {
		b := r[(i+1)%len(r)]
		if (a.y < y) != (b.y < y) {
			out = append(out, cut{a.x + (b.x-a.x)*(y-a.y)/(b.y-a.y), i})
		}
	}
	slices.SortFunc(out, func(a, b cut) int { return cmp.Compare(a.x, b.x) })
	return out
}

// at is the x of an edge of the ring at a level.
func (r ring) at(edge int, y float64) float64 {
	a, b := r[edge], r[(edge+1)%len(r)]
	return a.x + (b.x-a.x)*(y-a.y)/(b.y-a.y)
}

// width is the length of the ring's inside at a level, by the edges that are
// cut at mid, a level next to it.
func (r ring) width(mid, y float64) (sum float64) {
	for i, c := range r.cuts(mid) {
		x := r.at(c.edge, y)
		if i%2 == 0 {
			x = -x
		}
		sum += x
	}
	return sum
}

func (r ring) holds(p corner) bool {
	inside := false
	for _, c := range r.cuts(p.y) {
		if c.x < p.x {
			inside = !inside
		}
	}
	return inside
}

func (r ring) levels(dst []float64) []float64 {
	for _, c := range r {
		dst = append(dst, c.y)
	}
	return dst
}

// polygon measures an outline, and sets the section's width and depth.
func (s *Section) polygon() (g Geometry, faults []Fault) {
	fault := func(path, allowed, format string, args ...any) {
		faults = append(faults, Fault{Path: "/section/" + path, Detail: fmt.Sprintf(format, args...), Allowed: allowed})
	}
	corners := func(path string, points []Point) bool {
		if n := len(points); n < 3 || n > mostCorners {
			fault(path, fmt.Sprintf("3 to %d", mostCorners), "%d corners given", n)
			return false
		}
		for i, p := range points {
			if !(math.Abs(p.X.In(units.Metre)) <= mostCoordinate && math.Abs(p.Y.In(units.Metre)) <= mostCoordinate) {
				fault(fmt.Sprintf("%s/%d", path, i), "-100 m to 100 m", "a corner is at %s, %s", p.X, p.Y)
				return false
			}
		}
		return true
	}
	if !corners("outline", s.Outline) {
		return g, faults
	}
	outer := ringOf(s.Outline)
	if outer.area() < leastArea || crosses(outer, outer) {
		fault("outline", "a line that does not cross or touch itself", "the corners do not enclose an area in one piece")
		return g, faults
	}
	voids := make([]ring, 0, len(s.Voids))
	for i, points := range s.Voids {
		path := fmt.Sprintf("voids/%d", i)
		if !corners(path, points) {
			return g, faults
		}
		v := ringOf(points)
		sound := v.area() >= leastArea && !crosses(v, v) && !crosses(v, outer) && outer.holds(v[0])
		for _, other := range voids {
			sound = sound && !crosses(v, other) && !other.holds(v[0]) && !v.holds(other[0])
		}
		if !sound {
			fault(path, "inside the outline, clear of it and of the other voids", "a void is no hollow of the section")
			return g, faults
		}
		voids = append(voids, v)
	}
	levels := outer.levels(nil)
	for _, v := range voids {
		levels = v.levels(levels)
	}
	slices.Sort(levels)
	slices.Reverse(levels)
	top, bottom := levels[0], levels[len(levels)-1]
	levels = slices.CompactFunc(levels, func(a, b float64) bool { return math.Abs(a-b) <= 1e-9*(top-bottom) })
	levels[len(levels)-1] = bottom

	left, right := math.Inf(-1), math.Inf(1) // of the strip
	least := math.Inf(1)
	for i := 1; i < len(levels); i++ {
		high, low := levels[i-1], levels[i]
		mid := (high + low) / 2
		across := outer.cuts(mid)
		if len(across) != 2 {
			fault("outline", "an outline that every level cuts in one piece", "the section falls apart at a level")
			return Geometry{}, faults
		}
		p := mechanics.Part{Top: units.Metre.Of(top - high), Bottom: units.Metre.Of(top - low)}
		widths := [2]float64{outer.width(mid, high), outer.width(mid, low)}
		for _, v := range voids {
			if len(v.cuts(mid)) > 0 {
				widths[0] -= v.width(mid, high)
				widths[1] -= v.width(mid, low)
			}
		}
		for k, y := range [2]float64{high, low} {
			left, right = max(left, outer.at(across[0].edge, y)), min(right, outer.at(across[1].edge, y))
			least = min(least, widths[k])
			if widths[k] < leastWidth {
				fault("outline", "at least "+units.Metre.Of(leastWidth).String()+" of concrete at every level", "the section is %s wide at a level", units.Metre.Of(max(0, widths[k])))
				return Geometry{}, faults
			}
		}
		p.Width, p.BottomWidth = units.Metre.Of(widths[0]), units.Metre.Of(widths[1])
		g.Parts = append(g.Parts, p)
	}
	if right-left < leastWidth {
		fault("outline", "a strip that runs through from top to bottom", "no upright strip lies inside the outline over the whole depth, so that no stirrup can stand in it")
		return Geometry{}, faults
	}
	ends := [2]float64{math.Inf(1), math.Inf(-1)}
	for _, c := range outer {
		ends[0], ends[1] = min(ends[0], c.x), max(ends[1], c.x)
	}
	area := outer.area()
	g.Enclosed, g.Perimeter = units.SquareMetre.Of(area), units.Metre.Of(outer.perimeter())
	for _, v := range voids {
		area -= v.area()
		g.wall(v, left, right, top, bottom)
	}
	g.Gross = units.SquareMetre.Of(area)
	g.TopWidth, g.BottomWidth = g.Parts[0].Width, g.Parts[len(g.Parts)-1].BottomWidth
	g.Form = g.Perimeter.Sub(g.TopWidth)
	g.Web = units.Metre.Of(min(least, right-left))
	slip := 1e-6 * (right - left)
	for i, x := range [2]float64{left - slip, right + slip} {
		g.OverhangThickness[i] = units.Metre.Of(outer.turned().width(x, x))
	}
	g.WebLeft, g.Overall = units.Metre.Of(left-ends[0]), units.Metre.Of(ends[1]-ends[0])
	s.Width, s.Depth = units.Metre.Of(right-left), units.Metre.Of(top-bottom)
	return g, nil
}

// turned is the ring with its axes exchanged.
func (r ring) turned() ring {
	t := make(ring, len(r))
	for i, c := range r {
		t[i] = corner{c.y, c.x}
	}
	return t
}

// Clipped is the area inside the outside perimeter, and that perimeter, of a
// polygon whose overhangs beyond the strip of its Width are cut off at given
// widths. Its Width and Depth are those that GeometryOf found.
func (s *Section) Clipped(g *Geometry, left, right units.Length) (units.Area, units.Length) {
	from, sum := math.Inf(1), 0.0
	s.eachEdge(func(a, b corner) {
		from = min(from, a.x)
		sum += a.x*b.y - b.x*a.y
	})
	low := from + g.WebLeft.Sub(left).In(units.Metre)
	high := from + g.WebLeft.Add(s.Width).Add(right).In(units.Metre)
	// Counter-clockwise the area is the integral of x over y, with x held
	// between both cuts; and along a cut lies the height of what goes on beyond.
	area, perimeter, turn := 0.0, 0.0, math.Copysign(1, sum)
	s.eachEdge(func(a, b corner) {
		places := [4]float64{0, 1, 1, 1}
		n := 1
		for _, x := range [2]float64{low, high} {
			if (a.x < x) != (b.x < x) {
				places[n] = (x - a.x) / (b.x - a.x)
				n++
			}
		}
		if places[2] < places[1] && n == 3 {
			places[1], places[2] = places[2], places[1]
		}
		for k := range n {
			x := a.x + (b.x-a.x)*(places[k]+places[k+1])/2
			rise := turn * (b.y - a.y) * (places[k+1] - places[k])
			area += min(max(x, low), high) * rise
			switch {
			case x < low:
				perimeter -= rise
			case x > high:
				perimeter += rise
			default:
				perimeter += math.Hypot(b.x-a.x, b.y-a.y) * (places[k+1] - places[k])
			}
		}
	})
	return units.SquareMetre.Of(area), units.Metre.Of(perimeter)
}

// eachEdge visits the edges of a polygon's outline, in metres.
func (s *Section) eachEdge(visit func(a, b corner)) {
	at := func(p Point) corner { return corner{p.X.In(units.Metre), p.Y.In(units.Metre)} }
	for i, p := range s.Outline {
		visit(at(p), at(s.Outline[(i+1)%len(s.Outline)]))
	}
}

const (
	mostCoordinate = 100.0 // m
	leastArea      = 1e-4  // m2
	leastWidth     = 0.01  // m
)

// wall takes a hollow into account for the thickness of the walls about it.
func (g *Geometry) wall(v ring, left, right, top, bottom float64) {
	side, up, down := math.Inf(1), math.Inf(1), math.Inf(1)
	from, to := math.Inf(1), math.Inf(-1)
	for _, c := range v {
		from, to = min(from, c.x-left), max(to, c.x-left)
		side = min(side, c.x-left, right-c.x)
		up, down = min(up, top-c.y), min(down, c.y-bottom)
	}
	take := func(to *units.Length, thickness float64) {
		if t := units.Metre.Of(max(0, thickness)); !g.Hollow || t.Less(*to) {
			*to = t
		}
	}
	take(&g.SideWall, side)
	take(&g.TopWall, up)
	take(&g.BottomWall, down)
	g.Hollow = true
	g.Hollows = append(g.Hollows, [2]units.Length{units.Metre.Of(from), units.Metre.Of(to)})
}
