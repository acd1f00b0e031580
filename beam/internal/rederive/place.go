package rederive

import (
	"cmp"
	"fmt"
	"math"
	"slices"

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

// bar is one bar, or a bundle of n that counts as one, where its centre of
// area lies: x from the left side of the web, y from its own face. The radius
// is that of the one bar that it counts as (25.6.1.6).
type bar struct {
	x, y, r, area float64
	number        int
	fy            float64
	n             int
}

// real is the radius of each bar.
func (o *bar) real() float64 { return o.r / math.Sqrt(float64(o.n)) }

// wide is how far the outermost bars are off the centre, to their centres.
func (o *bar) wide() float64 {
	if o.n == 1 {
		return 0
	}
	return o.real()
}

// low and high are how far a bundle reaches towards its face and away: two
// bars lie beside each other, a third between and above them, four in a square.
func (o *bar) low() float64 {
	return o.real() * [...]float64{1: 1, 1, 1 + 1/math.Sqrt(3), 2}[o.n]
}

func (o *bar) high() float64 {
	return o.real() * [...]float64{1: 1, 1, 1 + 2/math.Sqrt(3), 2}[o.n]
}

// singles are the centres of its bars.
func (o *bar) singles() [][2]float64 {
	r := o.real()
	bottom := [2]float64{o.x - r, o.y - o.low() + r}
	switch o.n {
	case 2:
		return [][2]float64{bottom, {o.x + r, bottom[1]}}
	case 3:
		return [][2]float64{bottom, {o.x + r, bottom[1]}, {o.x, o.y + o.high() - r}}
	case 4:
		return [][2]float64{bottom, {o.x + r, bottom[1]}, {o.x - r, o.y + r}, {o.x + r, o.y + r}}
	}
	return [][2]float64{{o.x, o.y}}
}

// bed is the steel of one face.
type bed struct {
	layers   [][]bar
	beside   []bar // in the flange beside the web
	relied   bool
	area     float64
	web      float64 // area of the bars in the web
	centroid float64 // from the face
	nearest  float64 // least y
	count    int
	faults   []fault
	tight    float64 // least clear gap over what is required; above one is well
	widest   float64 // centre to centre in the first layer
	cover    float64 // least clear cover of the first layer to the face
}

// fault is something wrong with how bars lie.
type fault struct{ rule, what string }

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
func (j *judge) lay(face beam.Face) (*bed, error) {
	p, c, l := j.printed, &j.cage, j.l
	b := &bed{tight: math.Inf(1), nearest: math.Inf(1), cover: math.Inf(1)}
	layers := 0
	for _, r := range l.Longitudinal {
		if r.Face == face {
			if !r.Flange {
				layers = max(layers, r.Layer)
			}
			b.relied = b.relied || r.InCompression
		}
	}
	of := func(r *beam.Row) (bar, error) {
		s, err := j.catalog.Size(r.Bar)
		if err != nil {
			return bar{}, err
		}
		d, n := p.length(s.Diameter), max(1, r.Bundled)
		if n > 4 || r.Count%n != 0 {
			return bar{}, fmt.Errorf("%d bars in bundles of %d", r.Count, n)
		}
		o := bar{r: d / 2 * math.Sqrt(float64(n)), area: p.area(s.Area) * float64(n), number: p.number(d), fy: j.fy, n: n}
		if !r.Yield.IsZero() {
			o.fy = p.stress(r.Yield)
		}
		return o, nil
	}
	for k := 1; k <= layers; k++ {
		var groups []bar
		var counts []int
		for i := range l.Longitudinal {
			r := &l.Longitudinal[i]
			if r.Face != face || r.Flange || r.Layer != k {
				continue
			}
			o, err := of(r)
			if err != nil {
				return nil, err
			}
			groups = append(groups, o)
			counts = append(counts, r.Count/o.n)
		}
		order := make([]int, len(groups))
		for i := range order {
			order[i] = i
		}
		slices.SortStableFunc(order, func(i, j int) int { return -cmp.Compare(groups[i].real(), groups[j].real()) })
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
				level = math.Max(level, o.y+o.high())
			}
			level += c.between
			b.upper(c, row, below, level)
		}
		b.layers = append(b.layers, row)
	}
	for n, row := range b.layers {
		for i, o := range row {
			b.web += o.area
			side := o.wide() + o.real()
			if o.x-side < c.inner-1e-9*c.width || c.width-o.x-side < c.inner-1e-9*c.width || o.y+o.high() > c.depth-c.inner+1e-9*c.depth {
				b.fault("inside the stirrup", "a bar lies outside the stirrup")
			}
			if i > 0 && (n == 0 || o.x > row[i-1].x) { // but for what lies above no bar
				b.gap(c, row[i-1], o)
			}
		}
	}
	if err := j.besides(b, face, of); err != nil {
		return nil, err
	}
	var moment float64
	for _, row := range append(slices.Clone(b.layers), b.beside) {
		for _, o := range row {
			b.area, moment, b.count = b.area+o.area, moment+o.area*o.y, b.count+o.n
			b.nearest = math.Min(b.nearest, o.y)
		}
	}
	if b.count > 0 {
		b.centroid = moment / b.area
		for i, o := range b.layers[0] {
			b.cover = math.Min(b.cover, o.y-o.low())
			if i > 0 {
				a := b.layers[0][i-1]
				b.widest = math.Max(b.widest, o.x-a.x)
			}
		}
	}
	return b, nil
}

// besides lays the bars in the flange beside the web, row by row outward.
func (j *judge) besides(b *bed, face beam.Face, of func(*beam.Row) (bar, error)) error {
	var ends [2]float64
	for i := range j.l.Longitudinal {
		r := &j.l.Longitudinal[i]
		if r.Face != face || !r.Flange {
			continue
		}
		if len(b.layers) == 0 || j.s.flange < 0 || (j.s.flange == 1) != (face == beam.Top) {
			return fmt.Errorf("bars in a flange that the %s has not", face)
		}
		o, err := of(r)
		if err != nil {
			return err
		}
		if len(b.beside) == 0 {
			row := b.layers[0]
			ends = [2]float64{row[0].x, row[len(row)-1].x}
		}
		o.y = j.cage.inner + o.r
		onLeft := (r.Count + 1) / 2
		switch {
		case j.s.over[0] == 0:
			onLeft = 0
		case j.s.over[1] == 0:
			onLeft = r.Count
		}
		for k := range r.Count {
			side := 1
			if k < onLeft {
				side = 0
			}
			ends[side] += float64(2*side-1) * j.length(r.Spacing)
			o.x = ends[side]
			out := o.x - j.cage.width
			if side == 0 {
				out = -o.x
			}
			if out+o.r+j.cover > j.s.over[side]*(1+1e-9) {
				b.fault("fit.flange", "a bar lies outside the flange")
			}
			if o.y+o.r+j.cover > j.s.thick*(1+1e-9) {
				b.fault("fit.flange-thickness", "a bar lies outside the flange")
			}
			b.beside = append(b.beside, o)
		}
	}
	slices.SortFunc(b.beside, func(a, o bar) int { return cmp.Compare(a.x, o.x) })
	return nil
}

func (b *bed) fault(rule, what string) {
	if f := (fault{rule, what}); !slices.Contains(b.faults, f) {
		b.faults = append(b.faults, f)
	}
}

// need is the clear distance required between two neighbours (25.2.1).
func (c *cage) need(a, o bar) float64 { return max(c.least, 2*a.r, 2*o.r) }

func (b *bed) gap(c *cage, a, o bar) {
	clear := math.Inf(1)
	for _, p := range a.singles() {
		for _, q := range o.singles() {
			clear = math.Min(clear, math.Hypot(q[0]-p[0], q[1]-p[1])-a.real()-o.real())
		}
	}
	if o.x <= a.x {
		clear = -1
		b.fault("fit.width", "bars overlap")
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
		row[i].y = c.inner + row[i].low()
	}
	if last == 0 {
		row[0].x = c.width / 2
		return
	}
	edge := func(i int) float64 {
		o := &row[i]
		if c.tucked {
			to := c.diagonal(o.real())
			o.y = c.inner + to - o.real() + o.low()
			return c.inner + to + o.wide()
		}
		return c.inner + math.Max(c.bend, o.real()) + o.wide()
	}
	row[0].x, row[last].x = edge(0), c.width-edge(last)
	steps := make([]float64, last)
	spare := row[last].x - row[0].x
	for i := range steps {
		steps[i] = c.step(row[i], row[i+1])
		if c.tucked && last > 1 && (i == 0 || i == last-1) {
			corner, inner := row[i], row[i+1]
			if i != 0 {
				corner, inner = inner, corner
			}
			steps[i] = math.Max(steps[i], math.Max(c.bend, inner.real())+inner.wide()-c.diagonal(corner.real())-corner.wide())
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
		if from := math.Min(row[i].x, c.width-row[i].x) - row[i].wide() - c.inner; from < math.Max(c.bend, row[i].real())-1e-9*c.width {
			b.fault("straight of the leg", "a bar rests on the bend of the stirrup")
		}
	}
	if 2*(c.inner+c.bend) > c.width*(1+1e-9) {
		b.fault("stirrup.bends", "the stirrup has no room for its bends")
	}
}

// step is the least distance across between the centres of two neighbours on
// the same leg: that at which their nearest bars keep the clear distance.
func (c *cage) step(a, o bar) float64 {
	a.x, o.x = 0, 0
	centres, most := a.real()+o.real()+c.need(a, o), 0.0
	for _, p := range a.singles() {
		for _, q := range o.singles() {
			dy := q[1] - p[1]
			most = math.Max(most, p[0]-q[0]+math.Sqrt(math.Max(0, centres*centres-dy*dy)))
		}
	}
	return most
}

// upper lays a layer above another: its outer bars over the outer bars, a
// middle one over the middle.
func (b *bed) upper(c *cage, row, below []bar, level float64) {
	n, m := len(below), len(row)
	if m > n {
		b.fault("spacing.alignment", "an upper layer has more bars than the one below")
		n = m
	}
	for i := range row {
		j := i
		if m%2 == 1 && i == m/2 {
			j = (n - 1) / 2
		} else if i >= m/2 {
			j = n - m + i
		}
		row[i].y = level + row[i].low()
		side := c.inner + row[i].wide() + row[i].real() // where a bundle is wider than what is below
		row[i].x = math.Max(side, math.Min(c.width-side, below[min(j, len(below)-1)].x))
	}
}
