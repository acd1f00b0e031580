package rederive

import (
	"cmp"
	"fmt"
	"math"
	"slices"

	"soffit.example/bars"
	"soffit.example/beam"
)

// cage is the inside of the stirrup, in the length of the edition.
type cage struct {
	width, depth float64
	inner        float64 // from any face of the form to the inner face of the stirrup's leg
	bend         float64 // inside radius of the stirrup
	tucked       bool
	least        float64 // clear gap within a layer but for the bars' own diameters
	between      float64 // clear gap between layers
}

// bar is one bar where it lies: x from the left face, y from its own face.
type bar struct {
	x, y, r, area float64
	number        int
}

// bed is the steel of one face.
type bed struct {
	layers   [][]bar
	relied   bool
	area     float64
	centroid float64 // from the face
	nearest  float64 // least y
	count    int
	faults   []string
	tight    float64 // least clear gap over what is required; above one is well
	widest   float64 // centre to centre in the first layer
	cover    float64 // least clear cover of the first layer to the face
}

// pairUp orders a layer from left to right: the thicker bars outside.
func pairUp(groups []bar, counts []int) []bar {
	var left, right, middle []bar
	for i, g := range groups {
		for range counts[i] / 2 {
			left, right = append(left, g), append(right, g)
		}
		if counts[i]%2 == 1 {
			middle = append(middle, g)
		}
	}
	slices.Reverse(right)
	return slices.Concat(left, middle, right)
}

// lay finds the coordinates of the bars of one face.
func (p *printed) lay(c *cage, catalog bars.Catalog, l *beam.Layout, face beam.Face) (*bed, error) {
	b := &bed{tight: math.Inf(1), nearest: math.Inf(1), cover: math.Inf(1)}
	layers := 0
	for _, r := range l.Longitudinal {
		if r.Face == face {
			layers = max(layers, r.Layer)
			b.relied = b.relied || r.InCompression
		}
	}
	for k := 1; k <= layers; k++ {
		var groups []bar
		var counts []int
		for _, r := range l.Longitudinal {
			if r.Face != face || r.Layer != k {
				continue
			}
			s, err := catalog.Size(r.Bar)
			if err != nil {
				return nil, err
			}
			d := p.length(s.Diameter)
			groups = append(groups, bar{r: d / 2, area: p.area(s.Area), number: p.number(d)})
			counts = append(counts, r.Count)
		}
		order := make([]int, len(groups))
		for i := range order {
			order[i] = i
		}
		slices.SortStableFunc(order, func(i, j int) int { return -cmp.Compare(groups[i].r, groups[j].r) })
		sorted, sizes := make([]bar, len(order)), make([]int, len(order))
		for i, j := range order {
			sorted[i], sizes[i] = groups[j], counts[j]
		}
		row := pairUp(sorted, sizes)
		if len(row) == 0 {
			return nil, fmt.Errorf("layer %d of the %s is empty", k, face)
		}
		if k == 1 {
			b.first(c, row)
		} else {
			below := b.layers[k-2]
			level := 0.0
			for _, o := range below {
				level = math.Max(level, o.y+o.r)
			}
			level += c.between
			b.upper(c, row, below, level)
		}
		b.layers = append(b.layers, row)
	}
	var moment float64
	for _, row := range b.layers {
		for i, o := range row {
			b.area, moment, b.count = b.area+o.area, moment+o.area*o.y, b.count+1
			b.nearest = math.Min(b.nearest, o.y)
			if o.x-o.r < c.inner-1e-9*c.width || c.width-o.x-o.r < c.inner-1e-9*c.width || o.y+o.r > c.depth-c.inner+1e-9*c.depth {
				b.fault("a bar lies outside the stirrup")
			}
			if i > 0 {
				b.gap(c, row[i-1], o)
			}
		}
	}
	if b.count > 0 {
		b.centroid = moment / b.area
		for i, o := range b.layers[0] {
			b.cover = math.Min(b.cover, o.y-o.r)
			if i > 0 {
				a := b.layers[0][i-1]
				b.widest = math.Max(b.widest, math.Hypot(o.x-a.x, o.y-a.y))
			}
		}
	}
	return b, nil
}

func (b *bed) fault(what string) {
	if !slices.Contains(b.faults, what) {
		b.faults = append(b.faults, what)
	}
}

// need is the clear distance required between two neighbours (25.2.1).
func (c *cage) need(a, o bar) float64 { return max(c.least, 2*a.r, 2*o.r) }

func (b *bed) gap(c *cage, a, o bar) {
	clear := math.Hypot(o.x-a.x, o.y-a.y) - a.r - o.r
	if o.x < a.x {
		clear = -math.Hypot(o.x-a.x, o.y-a.y) - a.r - o.r
	}
	b.tight = math.Min(b.tight, clear/c.need(a, o))
}

// diagonal is how far from both legs a bar lies that is pushed into the bend.
func (c *cage) diagonal(r float64) float64 {
	if r >= c.bend {
		return r
	}
	return c.bend - (c.bend-r)*math.Sqrt2/2
}

// first lays the layer on the stirrup's leg: corner bars at the tangent point
// of the bend, or in the bend; the gaps between share what is left.
func (b *bed) first(c *cage, row []bar) {
	last := len(row) - 1
	for i := range row {
		row[i].y = c.inner + row[i].r
	}
	if last == 0 {
		row[0].x = c.width / 2
		return
	}
	edge := func(i int) float64 {
		if c.tucked {
			row[i].y = c.inner + c.diagonal(row[i].r)
			return c.inner + c.diagonal(row[i].r)
		}
		return c.inner + math.Max(c.bend, row[i].r)
	}
	row[0].x, row[last].x = edge(0), c.width-edge(last)
	steps := make([]float64, last)
	spare := row[last].x - row[0].x
	for i := range steps {
		a, o := row[i], row[i+1]
		centres := a.r + o.r + c.need(a, o)
		dy := a.y - o.y
		steps[i] = math.Sqrt(math.Max(0, centres*centres-dy*dy))
		if c.tucked && last > 1 && (i == 0 || i == last-1) {
			corner, inner := a, o
			if i != 0 {
				corner, inner = o, a
			}
			steps[i] = math.Max(steps[i], math.Max(c.bend, inner.r)-c.diagonal(corner.r))
		}
		spare -= steps[i]
	}
	x := row[0].x
	for i := 1; i < last; i++ {
		x += steps[i-1] + spare/float64(last)
		row[i].x = x
	}
	// A bar between the corners rests on the straight of the leg.
	for i := 1; i < last; i++ {
		if from := math.Min(row[i].x, c.width-row[i].x) - c.inner; from < math.Max(c.bend, row[i].r)-1e-9*c.width {
			b.fault("a bar rests on the bend of the stirrup")
		}
	}
	if 2*(c.inner+c.bend) > c.width*(1+1e-9) {
		b.fault("the stirrup has no room for its bends")
	}
}

// upper lays a layer above another: its outer bars over the outer bars, a
// middle one over the middle.
func (b *bed) upper(c *cage, row, below []bar, level float64) {
	n, m := len(below), len(row)
	if m > n {
		b.fault("an upper layer has more bars than the one below")
		n = m
	}
	for i := range row {
		j := i
		if m%2 == 1 && i == m/2 {
			j = (n - 1) / 2
		} else if i >= m/2 {
			j = n - m + i
		}
		row[i].y = level + row[i].r
		row[i].x = below[min(j, len(below)-1)].x
	}
}
