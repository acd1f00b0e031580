package bars

import (
	"errors"
	"math"
	"strconv"

	"soffit.example/units"
)

// Layer is what lies at one level: bars of one size, or of several. Sizes are
// arranged with the larger ones outermost, symmetrically if the counts allow.
type Layer []Group

// Placed is a bar or a bundle where it lies; [Placed.AppendSingles] takes a
// bundle apart.
type Placed struct {
	Size  Size
	X     units.Length // of its centre of area, from the left face
	Y     units.Length // of its centre, from the face at which the bars lie
	Layer int          // 1 is nearest the face

	// across is how much of any extra width the bar moves to the right:
	// 0 at the left corner, 1 at the right. Positions are linear in it.
	across float64
	body   body // of Size, while it is laid
}

// Gap is the clear distance between two bars of a fit, A and B by index in
// Fit.Bars, with the distance required between those two. Between bundles the
// clear distance is that of their nearest bars, the required one follows from
// the diameters that the bundles count with. The zero Gap says that there is
// no pair.
type Gap struct {
	Clear, Required units.Length
	A, B            int
}

// Exists reports whether g is a gap between two bars.
func (g Gap) Exists() bool { return g.A != g.B }

// OK reports whether the clear distance suffices; a gap that does not exist
// does.
func (g Gap) OK() bool { return !g.Exists() || g.Required.AtMost(g.Clear) }

// tighter reports whether g has less to spare than h. Of gaps that differ by
// rounding alone neither is.
func (g Gap) tighter(h Gap) bool {
	return g.Exists() && (!h.Exists() || !h.Clear.Sub(h.Required).AtMost(g.Clear.Sub(g.Required)))
}

// LayerFit is how one layer lies.
type LayerFit struct {
	First, Count int          // its bars are Fit.Bars[First : First+Count], left to right
	Centroid     units.Length // from the face, weighted by area
	Cover        units.Length // least clear distance from the face to a bar
	// Beside is the pair of the layer's bars with least to spare, and Below
	// the pair with the layer below; of uniform bars they are the closest.
	Beside, Below Gap
	LeastClear    units.Length // between bars of the layer; zero with one bar
	// Spacing is the largest distance between the centres of neighbours,
	// bundles as a whole, as crack control asks for; zero with one bar.
	Spacing   units.Length
	Symmetric bool // about the middle of the width
	Aligned   bool // each bar directly above one of the layer below
	// MoreThanBelow says that the layer has more bars than the one below it,
	// so that it cannot be aligned.
	MoreThanBelow bool
}

// Fit is how layers of bars lie in a cage. The zero Fit is ready for
// [Fit.Lay].
type Fit struct {
	Bars   []Placed   // by layer from the face, then from left to right
	Layers []LayerFit // nearest the face first
	// LeastWidth is the least width of the form in which this arrangement
	// keeps every clear distance between neighbours and its place inside the
	// stirrup.
	LeastWidth units.Length
	Area       units.Area   // of all bars, added as decimals
	Centroid   units.Length // of all bars from the face, weighted by area
	Height     units.Length // from the face to the top of the highest bar

	width  float64 // of the form, m
	inside bool    // every bar lies inside the stirrup
}

// Fit lays layers of bars in the cage, the first one nearest the face, with
// successive layers as close as need allows. Bars that do not fit are laid
// all the same, closer than allowed or overlapping, and the gaps say so; only
// input that makes no sense is an error: a *[RangeError], or a *[NoRuleError]
// if BendRadius is zero and the stirrup's catalog has no bend rule for it.
func (c *Cage) Fit(layers []Layer, need Clearances) (*Fit, error) {
	f := new(Fit)
	if err := f.Lay(c, layers, need); err != nil {
		return nil, err
	}
	return f, nil
}

// Lay is [Cage.Fit] into an existing f, whose slices it reuses: once they
// have grown, laying allocates nothing. After an error f is empty.
func (f *Fit) Lay(c *Cage, layers []Layer, need Clearances) error {
	*f = Fit{Bars: f.Bars[:0], Layers: f.Layers[:0]}
	shape, err := c.form(need)
	if err != nil {
		return err
	}
	if err := checkLayers(layers); err != nil {
		return err
	}
	level := shape.base                      // of the bottoms of the layer's bars
	least := 2 * (shape.side + shape.radius) // the stirrup itself
	f.width, f.inside = shape.width, units.AtMost(least, shape.width)
	for i := range layers {
		first, start := len(f.Bars), 0 // start of the layer below
		if i > 0 {
			start = f.Layers[i-1].First
			level = shape.above(f.Bars[start:first], layers[i])
		}
		f.arrange(layers[i], i+1)
		row, below := f.Bars[first:], f.Bars[start:first]
		if i == 0 || len(row) > len(below) {
			shape.spread(row, level)
		} else {
			shape.stack(row, below, level)
		}
		f.Layers = append(f.Layers, measure(&shape, row, below, first))
		f.inside = f.inside && shape.holds(row)
		least = max(least, shape.leastWidth(row))
	}
	f.LeastWidth = units.Metre.Of(least)
	f.total()
	return nil
}

func checkLayers(layers []Layer) error {
	if len(layers) == 0 {
		return &RangeError{Field: "layers", Value: "0", Allowed: "at least 1"}
	}
	total := 0
	for i, l := range layers {
		if len(l) == 0 {
			return &RangeError{Field: "layers[" + strconv.Itoa(i) + "]", Value: "empty", Allowed: "at least 1 group of bars"}
		}
		for j := range l {
			if err := l[j].Size.Check(); err != nil {
				return inGroup(i, j, err)
			}
			if n := l[j].Count; n < 1 || n > MaxBars-total {
				return inGroup(i, j, &RangeError{Field: "count", Value: strconv.Itoa(n),
					Allowed: "at least 1, and " + strconv.Itoa(MaxBars) + " in all"})
			}
			total += l[j].Count
		}
	}
	return nil
}

// inGroup puts the place of a group before the field of a RangeError.
func inGroup(layer, group int, err error) error {
	var e *RangeError
	if errors.As(err, &e) {
		e.Field = "layers[" + strconv.Itoa(layer) + "][" + strconv.Itoa(group) + "]." + e.Field
	}
	return err
}

// arrange appends the bars of a layer in their order from left to right.
// Sizes are taken from the largest down and laid in pairs from the outside
// in. Odd bars meet in the middle: one of them keeps the symmetry, more
// cannot.
func (f *Fit) arrange(layer Layer, number int) {
	first := len(f.Bars)
	count := 0
	for i := range layer {
		count += layer[i].Count
	}
	for range count {
		f.Bars = append(f.Bars, Placed{Layer: number})
	}
	row := f.Bars[first:]
	left, right := 0, count-1
	for g := nextLargest(layer, -1); g >= 0; g = nextLargest(layer, g) {
		for range layer[g].Count / 2 {
			row[left].Size, row[right].Size = layer[g].Size, layer[g].Size
			left, right = left+1, right-1
		}
	}
	onLeft := true
	for g := nextLargest(layer, -1); g >= 0; g = nextLargest(layer, g) {
		if layer[g].Count%2 == 0 {
			continue
		}
		if onLeft {
			row[left].Size = layer[g].Size
			left++
		} else {
			row[right].Size = layer[g].Size
			right--
		}
		onLeft = !onLeft
	}
	for i := range row {
		row[i].body = row[i].Size.body()
	}
}

// nextLargest is the index of the group that follows group g in order of
// falling diameter, groups of one diameter keeping their order; -1 after the
// last. It starts after g = -1.
func nextLargest(layer Layer, g int) int {
	best := -1
	for i := range layer {
		d := layer[i].Size.Diameter
		after := g < 0 || d.Less(layer[g].Size.Diameter) || i > g && d == layer[g].Size.Diameter
		if after && (best < 0 || layer[best].Size.Diameter.Less(d)) {
			best = i
		}
	}
	return best
}

// total sums up the laid bars.
func (f *Fit) total() {
	var sum areaSum
	var area, moment, height float64
	for i := range f.Bars {
		b := &f.Bars[i]
		sum.add(&b.Size, 1)
		_, y := b.metres()
		a := b.Size.Area.In(units.SquareMetre)
		area += a
		moment += a * y
		height = max(height, y+b.body.high)
	}
	f.Area = sum.area()
	f.Centroid = units.Metre.Of(moment / area)
	f.Height = units.Metre.Of(height)
}

// Fits reports whether every clear distance is kept and every bar lies inside
// the stirrup. Whether upper bars stand directly above lower ones is another
// question: see [Fit.Aligned].
func (f *Fit) Fits() bool {
	return len(f.Bars) > 0 && f.inside && f.Horizontal().OK() && f.Vertical().OK()
}

// Aligned reports whether the bars of every layer but the first stand
// directly above bars of the layer below.
func (f *Fit) Aligned() bool {
	for i := 1; i < len(f.Layers); i++ {
		if !f.Layers[i].Aligned {
			return false
		}
	}
	return true
}

// Inside reports whether every bar lies inside the stirrup: beside its legs,
// clear of its bends and, if the cage has a depth, below its opposite leg.
func (f *Fit) Inside() bool { return f.inside }

// Horizontal is the gap with least to spare between neighbours of a layer.
func (f *Fit) Horizontal() Gap {
	var least Gap
	for i := range f.Layers {
		if g := f.Layers[i].Beside; g.tighter(least) {
			least = g
		}
	}
	return least
}

// Vertical is the gap with least to spare between bars of successive layers.
func (f *Fit) Vertical() Gap {
	var least Gap
	for i := range f.Layers {
		if g := f.Layers[i].Below; g.tighter(least) {
			least = g
		}
	}
	return least
}

// EdgeDistance is the distance from the centre of bar or bundle i to the
// nearest of the two side faces and the face at which the bars lie. It panics
// if i is not an index of f.Bars.
func (f *Fit) EdgeDistance(i int) units.Length {
	x, y := f.Bars[i].metres()
	return units.Metre.Of(min(x, f.width-x, y))
}

// NeighbourDistance is the distance between the centres of bar or bundle i
// and the one nearest to it in its own layer; zero if it has none. It panics
// if i is not an index of f.Bars.
func (f *Fit) NeighbourDistance(i int) units.Length {
	x, y := f.Bars[i].metres()
	layer := &f.Layers[f.Bars[i].Layer-1]
	nearest := math.Inf(1)
	for j := layer.First; j < layer.First+layer.Count; j++ {
		if j != i {
			u, v := f.Bars[j].metres()
			nearest = min(nearest, math.Hypot(u-x, v-y))
		}
	}
	if math.IsInf(nearest, 1) {
		return units.Length{}
	}
	return units.Metre.Of(nearest)
}
