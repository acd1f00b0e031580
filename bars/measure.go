package bars

import (
	"math"

	"soffit.example/units"
)

// sameDistance is the share of the form's width by which two positions may
// differ and still be one; it is the tolerance of every limit.
const sameDistance = 1e-9

// measure reads the gaps, spacings and cover of a laid row off its
// coordinates. The row's bars are those of a fit from index first on, and
// the layer below directly precedes them; it is empty for the first layer.
func measure(f *form, row, below []Placed, first int) LayerFit {
	on := LayerFit{
		First: first, Count: len(row),
		Symmetric:     symmetric(row, f.width),
		Aligned:       len(below) > 0 && aligned(row, below, f.width),
		MoreThanBelow: len(below) > 0 && len(row) > len(below),
	}
	var area, moment float64
	cover := math.Inf(1)
	near := reach(row)
	for i := range row {
		b := &row[i]
		x, y := b.metres()
		a := b.Size.Area.In(units.SquareMetre)
		area += a
		moment += a * y
		cover = min(cover, y-b.body.low)
		for j := range below {
			u, v := below[j].metres()
			lower := &below[j].body
			g := newGap(lower.centres(&b.body, x-u, y-v), lower, &b.body, f.vertical)
			g.A, g.B = first-len(below)+j, first+i
			if g.tighter(on.Below) {
				on.Below = g
			}
		}
		for j := i - 1; j >= max(0, i-near); j-- {
			u, v := row[j].metres()
			left := &row[j].body
			if j == i-1 {
				on.Spacing = on.Spacing.Max(units.Metre.Of(math.Hypot(x-u, y-v)))
			}
			centres := left.centres(&b.body, x-u, y-v)
			if x-u < (left.wide+b.body.wide)*(1-sameDistance) {
				// The form is so narrow that the bars changed places: count the
				// distance as negative, so that it grows with the width throughout.
				centres = -centres
			}
			g := newGap(centres, left, &b.body, f.clear)
			g.A, g.B = first+j, first+i
			if g.tighter(on.Beside) {
				on.Beside = g
			}
			if i == 1 || g.Clear.Less(on.LeastClear) {
				on.LeastClear = g.Clear
			}
		}
	}
	on.Centroid = units.Metre.Of(moment / area)
	on.Cover = units.Metre.Of(cover)
	return on
}

// reach is how many bars further left can be the closest to a bar: only its
// neighbour in a row of one kind; in others all, as two large bars can
// meet over small ones between them.
func reach(row []Placed) int {
	for i := range row {
		if !row[i].Size.sameKind(&row[0].Size) {
			return len(row)
		}
	}
	return 1
}

// newGap is the gap between a and b, whose nearest bars have centres so far
// apart.
func newGap(centres float64, a, b *body, need gap) Gap {
	clear := centres - (a.bar + b.bar)
	if math.Abs(clear) <= sameDistance*(a.bar+b.bar) {
		clear = 0 // they touch; a limit of zero has no slack for rounding
	}
	return Gap{Clear: units.Metre.Of(clear), Required: units.Metre.Of(need.between(a.counts, b.counts))}
}

// symmetric reports whether a row mirrors itself about the middle of the
// width, in position and in kind.
func symmetric(row []Placed, width float64) bool {
	for i, j := 0, len(row)-1; i <= j; i, j = i+1, j-1 {
		xi, _ := row[i].metres()
		xj, _ := row[j].metres()
		if !row[i].Size.sameKind(&row[j].Size) || math.Abs(xi+xj-width) > sameDistance*width {
			return false
		}
	}
	return true
}

// aligned reports whether each bar of a row has one directly below it.
func aligned(row, below []Placed, width float64) bool {
	for i := range row {
		x, found := row[i].X.In(units.Metre), false
		for j := range below {
			if math.Abs(x-below[j].X.In(units.Metre)) <= sameDistance*width {
				found = true
				break
			}
		}
		if !found {
			return false
		}
	}
	return true
}

// margin is how far a bar's centre must keep from the inner faces of the side
// legs where it lies.
func (f *form) margin(p *Placed) float64 {
	_, y := p.metres()
	keep := 0.0
	if p.Layer == 1 {
		keep = f.edge(p)
	}
	for i := range p.body.n {
		u, v := p.body.at(i)
		height := f.top - (y + v) // over the nearer of the horizontal legs
		if p.Layer > 1 {
			height = min(height, y+v-f.base)
		}
		keep = max(keep, f.wall(p.body.bar, height)-u)
	}
	return keep
}

// holds reports whether every bar of a laid row lies inside the stirrup.
func (f *form) holds(row []Placed) bool {
	for i := range row {
		x, y := row[i].metres()
		keep := f.side + f.margin(&row[i])
		if !units.AtMost(keep, x) || !units.AtMost(keep, f.width-x) || !units.AtMost(y+row[i].body.high, f.top) {
			return false
		}
	}
	return true
}

// leastWidth is the width of the form at which a laid row just keeps its
// clear distances and its margins. Every position is linear in the width, so
// each condition gives its own least width directly.
func (f *form) leastWidth(row []Placed) float64 {
	least, near := 0.0, reach(row)
	for i := range row {
		b := &row[i]
		x, y := b.metres()
		keep := f.side + f.margin(b)
		if b.across > 0 {
			least = max(least, f.width+(keep-x)/b.across)
		}
		if b.across < 1 {
			least = max(least, f.width+(keep-(f.width-x))/(1-b.across))
		}
		for j := i - 1; j >= max(0, i-near); j-- {
			a := &row[j]
			u, v := a.metres()
			need := f.pitch(&a.body, &b.body, y-v)
			least = max(least, f.width+(need-(x-u))/(b.across-a.across))
		}
	}
	return least
}
