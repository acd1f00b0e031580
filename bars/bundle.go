package bars

import (
	"math"
	"strconv"

	"soffit.example/units"
)

// MaxBundle is the most bars in a bundle: two lie side by side, three in a
// triangle with two of them nearer the face, four in a square.
const MaxBundle = 4

// Bundle is n bars of one size in contact, laid as one unit. As design codes
// count it (ACI 318-19 25.6.1.6), the Size that stands for it is one bar at
// the common centroid with n times the area, so that its diameter is the
// bar's times the root of n; [Size.Bundled] and [Size.Single] tell what it is
// made of, [Size.Extent] the room it takes. Its name is that of the bar after
// the count, "2x#9". Number and Order stay those of the bar; Overall is zero.
//
// The count is 1, which gives back the bar itself, to [MaxBundle]; how many a
// code allows is another question. The error is a *[RangeError].
func Bundle(s Size, n int) (Size, error) {
	switch {
	case n < 1 || n > MaxBundle:
		return Size{}, &RangeError{Field: "bundle", Value: strconv.Itoa(n) + " bars", Allowed: "1 to " + strconv.Itoa(MaxBundle) + " bars"}
	case s.Bundled() > 1:
		return Size{}, &RangeError{Field: "bundle", Value: "of " + s.Name, Allowed: "bars that are not bundled already"}
	}
	if err := s.Check(); err != nil || n == 1 {
		return s, err
	}
	b := s
	b.Name = strconv.Itoa(n) + "x" + s.Name
	b.bundled = uint8(n)
	b.Diameter = s.Diameter.Scale(math.Sqrt(float64(n)))
	b.Overall = units.Length{}
	b.Area = TotalArea(Group{Size: s, Count: n})
	b.MassPerLength = s.MassPerLength.Scale(float64(n))
	if err := b.Check(); err != nil {
		return Size{}, err
	}
	return b, nil
}

// Bundle finds a size of the catalog, or a bundle of one, by its name: "#9"
// or "2x#9". The error is an *[UnknownError], or a *[RangeError] for a bundle
// of too many bars.
func (c Catalog) Bundle(name string) (Size, error) {
	// A catalog may have sizes whose own names look like a bundle.
	if len(name) < 3 || name[0] < '2' || name[0] > '9' || name[1] != 'x' || c.read().find(name) >= 0 {
		return c.Size(name)
	}
	s, err := c.Size(name[2:])
	if err != nil {
		return Size{}, err
	}
	return Bundle(s, int(name[0]-'0'))
}

// Bundled is the number of bars in contact that s stands for: 1, or 2 to
// [MaxBundle] for a [Bundle].
func (s Size) Bundled() int { return max(1, int(s.bundled)) }

// Single is the bar that a bundle is made of, or s itself. It is exact for a
// bar from a catalog, and within rounding for one made by hand.
func (s Size) Single() Size {
	if s.bundled < 2 {
		return s
	}
	n := float64(s.bundled)
	s.bundled = 0
	s.Name = s.Name[len("2x"):]
	if s.rec != nil {
		s.Diameter, s.Overall, s.Area, s.MassPerLength = s.rec.bar.diameter, s.rec.bar.overall, s.rec.bar.area, s.rec.bar.mass
		return s
	}
	s.Diameter = s.Diameter.Scale(1 / math.Sqrt(n))
	s.Area = s.Area.Scale(1 / n)
	s.MassPerLength = s.MassPerLength.Scale(1 / n)
	return s
}

// Extent is the room that a bar or a bundle takes about its centre of area:
// half its width, and how far it reaches towards the face at which it lies
// and away from it. For a single bar each is its radius.
func (s Size) Extent() (halfWidth, towards, away units.Length) {
	b := s.body()
	return units.Metre.Of(b.wide + b.bar), units.Metre.Of(b.low), units.Metre.Of(b.high)
}

// AppendSingles appends the real bars of p to dst, those of a bundle from the
// face and then from left to right; a single bar is appended as it is.
func (p *Placed) AppendSingles(dst []Placed) []Placed {
	b := p.Size.body()
	x, y := p.metres()
	single := Placed{Size: p.Size.Single(), Layer: p.Layer, across: p.across}
	single.body = single.Size.body()
	for i := range b.n {
		u, v := b.at(i)
		single.X, single.Y = units.Metre.Of(x+u), units.Metre.Of(y+v)
		dst = append(dst, single)
	}
	return dst
}

// AppendSingles appends every real bar of the fit to dst, in the order of
// f.Bars with each bundle taken apart.
func (f *Fit) AppendSingles(dst []Placed) []Placed {
	for i := range f.Bars {
		dst = f.Bars[i].AppendSingles(dst)
	}
	return dst
}

// Clear is the clear distance between p and q, of bundles that between their
// nearest bars; it is negative where bars overlap.
func (p *Placed) Clear(q *Placed) units.Length {
	a, b := p.Size.body(), q.Size.body()
	x, y := p.metres()
	u, v := q.metres()
	return units.Metre.Of(a.centres(&b, u-x, v-y) - (a.bar + b.bar))
}

// body is the room that a bar or a bundle takes, in metres. Every bundle has
// one of its bars lowest on each side, so that those two decide how it lies
// in the corners of a stirrup.
type body struct {
	n      int     // bars
	bar    float64 // radius of each
	counts float64 // radius of the one bar that it counts as
	wide   float64 // from its centre to the centres of its outermost bars
	low    float64 // from its bottom to its centre
	high   float64 // from its centre to its top
}

// pattern holds the centres of a bundle's bars from their common centroid, in
// bar radii, by number of bars.
var pattern = [MaxBundle + 1][MaxBundle]struct{ x, y float64 }{
	2: {{-1, 0}, {1, 0}},
	3: {{-1, -1 / sqrt3}, {1, -1 / sqrt3}, {0, 2 / sqrt3}},
	4: {{-1, -1}, {1, -1}, {-1, 1}, {1, 1}},
}

const sqrt3 = 1.7320508075688772935274463415058723669428

func (s *Size) body() body {
	r := s.Diameter.In(units.Metre) / 2
	if s.bundled < 2 {
		return body{n: 1, bar: r, counts: r, low: r, high: r}
	}
	b := body{n: int(s.bundled), counts: r}
	b.bar = r / math.Sqrt(float64(b.n))
	b.wide = b.bar
	_, first := b.at(0)
	_, last := b.at(b.n - 1)
	b.low, b.high = b.bar-first, b.bar+last
	return b
}

// at is the centre of bar i from the common centroid.
func (b *body) at(i int) (x, y float64) {
	return b.bar * pattern[b.n][i].x, b.bar * pattern[b.n][i].y
}

// centres is the least distance between the centres of a bar of a and a bar
// of b, which lies dx to the right and dy above.
func (a *body) centres(b *body, dx, dy float64) float64 {
	if a.n == 1 && b.n == 1 {
		return math.Hypot(dx, dy)
	}
	least := math.Inf(1)
	for i := range a.n {
		xi, yi := a.at(i)
		for j := range b.n {
			xj, yj := b.at(j)
			least = min(least, math.Hypot(dx+xj-xi, dy+yj-yi))
		}
	}
	return least
}

// sameKind reports whether two sizes take the same room.
func (s *Size) sameKind(o *Size) bool { return s.Diameter == o.Diameter && s.bundled == o.bundled }
