package bars

import "soffit.example/units"

// metres is the position of the centre of a bar or a bundle.
func (p *Placed) metres() (x, y float64) {
	return p.X.In(units.Metre), p.Y.In(units.Metre)
}

func (p *Placed) put(x, y, across float64) {
	p.X, p.Y, p.across = units.Metre.Of(x), units.Metre.Of(y), across
}

// inCorner reports whether p is a corner bar of the layer nearest the face,
// the only ones that can be tucked.
func (p *Placed) inCorner() bool { return p.Layer == 1 && (p.across == 0 || p.across == 1) }

// above is the level on which a layer rests: spacers of the required clear
// distance lie on the highest bar of the layer below.
func (f *form) above(below []Placed, layer Layer) float64 {
	top, largest := 0.0, 0.0
	for i := range below {
		_, y := below[i].metres()
		top = max(top, y+below[i].body.high)
		largest = max(largest, below[i].body.counts)
	}
	for i := range layer {
		largest = max(largest, layer[i].Size.Diameter.In(units.Metre)/2)
	}
	return top + f.vertical.between(largest, largest)
}

// spread lays a row on a level with its outermost bars in the corners and
// shares what is left of the width equally among the gaps, over what each
// requires. The corners of upper layers are seated ones.
func (f *form) spread(row []Placed, level float64) {
	last := len(row) - 1
	if last == 0 {
		row[0].put(f.width/2, level+row[0].body.low, 0.5)
		return
	}
	for i := range row {
		row[i].put(0, level+row[i].body.low, float64(i)/float64(last))
	}
	left, right := f.edge(&row[0]), f.edge(&row[last])
	for _, corner := range [...]*Placed{&row[0], &row[last]} {
		if f.tucked && corner.inCorner() {
			corner.Y = units.Metre.Of(level + f.nook(corner.body.bar) + (corner.body.low - corner.body.bar))
		}
	}
	x, end := f.side+left, f.width-f.side-right
	share := end - x
	for i := range last {
		share -= f.step(&row[i], &row[i+1])
	}
	share /= float64(last)
	for i := range last {
		row[i].X = units.Metre.Of(x)
		x += f.step(&row[i], &row[i+1]) + share
	}
	row[last].X = units.Metre.Of(end)
}

// edge is where a spread row keeps a bar off the inner faces of the side
// legs: a corner bar of a tucked cage by its own rule, others past the
// tangent point.
func (f *form) edge(p *Placed) float64 {
	if f.tucked && p.inCorner() {
		return f.tuck(&p.body)
	}
	return f.seat(&p.body)
}

// step is the least horizontal distance between the centres of neighbours a
// and b of a spread row, a on the left. Beside a tucked corner bar it also
// keeps the neighbour, which rests on the leg, past the bend.
func (f *form) step(a, b *Placed) float64 {
	_, ya := a.metres()
	_, yb := b.metres()
	least := f.pitch(&a.body, &b.body, yb-ya)
	if !f.tucked {
		return least
	}
	switch cornerA, cornerB := a.inCorner(), b.inCorner(); {
	case cornerA && !cornerB:
		least = max(least, f.seat(&b.body)-f.tuck(&a.body))
	case cornerB && !cornerA:
		least = max(least, f.seat(&a.body)-f.tuck(&b.body))
	}
	return least
}

// stack lays a row of no more bars than below directly above those: above the
// outermost pairs, and an odd bar above the middle (of an even layer below,
// the bar left of it). A bar too wide for its place in the corner moves
// inwards.
func (f *form) stack(row, below []Placed, level float64) {
	m, n := len(row), len(below)
	for i := range row {
		j := i
		switch {
		case m%2 == 1 && i == m/2:
			j = (n - 1) / 2
		case i >= m/2:
			j = n - m + i
		}
		row[i].put(below[j].X.In(units.Metre), level+row[i].body.low, below[j].across)
		switch keep := units.Metre.Of(f.side + f.margin(&row[i])); row[i].across {
		case 0:
			row[i].X = row[i].X.Max(keep)
		case 1:
			row[i].X = row[i].X.Min(units.Metre.Of(f.width).Sub(keep))
		}
	}
}
