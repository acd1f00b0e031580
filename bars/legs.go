package bars

import (
	"math"
	"slices"
	"strconv"

	"soffit.example/units"
)

// Centreline is the stirrup between the centre lines of its legs: the form
// less the covers and a stirrup's diameter, as torsion asks for. The depth is
// zero if the cage has none.
func (c *Cage) Centreline() (width, depth units.Length) {
	width, depth = c.Outside()
	width = width.Sub(c.Stirrup.Diameter)
	if !c.Depth.IsZero() {
		depth = depth.Sub(c.Stirrup.Diameter)
	}
	return width, depth
}

// Enclosed is the area within the centre line of a closed stirrup and the
// length of that line, its bends taken as sharp corners (Aoh and ph of ACI
// 318-19 22.7.6.1). Both are zero if the cage has no depth or leaves the
// stirrup no room.
func (c *Cage) Enclosed() (units.Area, units.Length) {
	width, depth := c.Centreline()
	if none := (units.Length{}); !none.Less(width) || !none.Less(depth) {
		return units.Area{}, none
	}
	return width.MulLength(depth), width.Add(depth).Scale(2)
}

// AppendLegs appends to x the centre lines of n stirrup legs across the cage,
// from left to right and measured from the left face. The outer two stand at
// the covers. An inner leg goes round a bar of row, the layer of a [Fit] that
// it holds: beside the bar, on the side away from the middle. Of the bars
// between the corner ones each is held at most once, those nearest to an even
// spacing of the legs. Where too few of them have room for a leg beside them,
// or without a row, the inner legs are evenly spaced and held is false; with
// two legs it is true.
//
// The cage needs a stirrup of which two legs fit in its width. The count is 2
// to 20. The error is a *[RangeError], or a *[NoRuleError] as in [Cage.Fit].
func (c *Cage) AppendLegs(x []units.Length, n int, row []Placed) (legs []units.Length, held bool, err error) {
	shape, err := c.form(Clearances{})
	if err != nil {
		return x, false, err
	}
	if n < 2 || n > maxLegs {
		return x, false, &RangeError{Field: "legs", Value: strconv.Itoa(n), Allowed: "2 to " + strconv.Itoa(maxLegs)}
	}
	if c.Stirrup.IsZero() {
		return x, false, &RangeError{Field: "stirrup", Value: "none", Allowed: "a size"}
	}
	bar := c.Stirrup.Diameter.In(units.Metre)
	left, right := shape.side-bar/2, shape.width-shape.side+bar/2
	if least := 2 * shape.side; !units.AtMost(least, shape.width) {
		return x, false, outside("width", c.Width, "at least "+units.Metre.Of(least).String()+" for two legs")
	}
	var at [maxLegs]float64
	for k := range n {
		at[k] = left + (right-left)*float64(k)/float64(n-1)
	}
	at[n-1] = right
	held = hold(at[1:n-1], row, shape.width, bar)
	for _, v := range at[:n] {
		x = append(x, units.Metre.Of(v))
	}
	return x, held, nil
}

// hold moves evenly spaced inner legs beside bars of a row, and reports
// whether it could; if not, it leaves them where they are.
func hold(legs []float64, row []Placed, width, bar float64) bool {
	inner, count := len(row)-2, len(legs)
	if count > max(0, inner) {
		return false
	}
	// Pairs from the outside in, so that a symmetric row is held symmetrically.
	// A pair leaves enough bars between its own for the legs between.
	var moved [maxLegs]float64
	low, high := 1, inner // bars still free
	for k := 0; k < (count+1)/2; k++ {
		mirror := count - 1 - k
		last := low // the furthest bar that the left leg may take
		if k == mirror {
			last = high
		} else {
			last += (high - low + 1 - (mirror - k + 1)) / 2
		}
		i, ok := nearest(row, low, last, legs[k], width, bar, &moved[k])
		if k < mirror {
			j, okRight := nearest(row, high, high-(last-low), legs[mirror], width, bar, &moved[mirror])
			ok, high = ok && okRight, j-1
		}
		if !ok {
			return false
		}
		low = i + 1
	}
	copy(legs, moved[:count])
	slices.Sort(legs)
	return true
}

// nearest finds, from bar i of a row to bar j, the one beside which a leg has
// room and comes closest to a place; of equals the first. It puts the leg
// there.
func nearest(row []Placed, i, j int, place, width, bar float64, leg *float64) (found int, ok bool) {
	best := math.Inf(1)
	for step := 1; ; i += step {
		// Places that differ by rounding are equal.
		at, fits := beside(row, i, width, bar)
		if off := math.Abs(at - place); fits && off < best-sameDistance*width {
			best, found, ok, *leg = off, i, true, at
		}
		if i == j {
			return found, ok
		}
		if j < i {
			step = -1
		}
	}
}

// beside is where a leg stands that goes round bar i of a row, and whether it
// fits between that bar and its neighbour.
func beside(row []Placed, i int, width, bar float64) (at float64, fits bool) {
	side, next := -1.0, &row[i-1]
	x, _ := row[i].metres()
	if width/2+sameDistance*width < x {
		side, next = 1, &row[i+1]
	}
	b, o := row[i].Size.body(), next.Size.body()
	u, _ := next.metres()
	clear := side*(u-x) - (b.wide + b.bar + o.wide + o.bar)
	return x + side*(b.wide+b.bar+bar/2), units.AtMost(bar, clear)
}

// WidestApart is the largest distance between neighbours of a set of places
// across a beam, in order from left to right, such as its stirrup legs; zero
// with fewer than two.
func WidestApart(x []units.Length) units.Length {
	var widest units.Length
	for i := 1; i < len(x); i++ {
		widest = widest.Max(x[i].Sub(x[i-1]))
	}
	return widest
}
