package beam

import (
	"cmp"
	"math"
	"slices"

	"soffit.example/bars"
	"soffit.example/units"
)

// barSet is a choice of longitudinal bars for one face: up to MaxLayers
// layers of one size, or of two with the larger at the corners, and bars of
// one size in the flange beside the web.
type barSet struct {
	barPlan
	used   int // layers
	count  int
	area   units.Area
	mass   float64 // kg/m
	sizes  int     // different sizes, 1 or 2
	widest float64 // m between neighbours of the first layer, of sets with bars beside the web

	judged, passes bool
	cover          units.Length // with which it was judged
}

// barPlan is what tells one set from another.
type barPlan struct {
	layers [MaxLayers][2]barGroup
	flange flangeRow // none where its count is zero
}

// barGroup is some bars of one size. A search makes thousands of sets, so
// they point at their sizes rather than hold them.
type barGroup struct {
	size  *bars.Size
	count int
}

// add puts a group into a layer.
func (b *barSet) add(layer int, size *bars.Size, count int) {
	if count == 0 {
		return
	}
	slot := 0
	if b.layers[layer][0].count > 0 {
		slot = 1
	}
	b.layers[layer][slot] = barGroup{size, count}
	b.used = max(b.used, layer+1)
	b.tally(size, count)
}

// beside puts bars into the flange beside the web.
func (b *barSet) beside(size *bars.Size, count int, spacing units.Length) {
	b.flange = flangeRow{size, count, spacing}
	b.tally(size, count)
}

// tally adds bars to what the set comes to.
func (b *barSet) tally(size *bars.Size, count int) {
	b.count += count
	b.area = b.area.Add(size.Area.Scale(float64(count)))
	b.mass += size.MassPerLength.In(units.KilogramPerMetre) * float64(count)
}

// inLayer is the number of bars in a layer of the web.
func (b *barSet) inLayer(i int) int { return b.layers[i][0].count + b.layers[i][1].count }

// rows is the number of marks that the set needs.
func (b *barSet) rows() int {
	return b.used*b.sizes + min(b.flange.count, 1)
}

// largest is the largest bar of the set.
func (b *barSet) largest() bars.Size {
	if b.used == 0 {
		return bars.Size{}
	}
	s := b.layers[0][0].size
	for i := range b.layers[:b.used] {
		for _, g := range b.layers[i] {
			if g.count > 0 && s.Diameter.Less(g.size.Diameter) {
				s = g.size
			}
		}
	}
	if b.flange.count > 0 && s.Diameter.Less(b.flange.size.Diameter) {
		s = b.flange.size
	}
	return *s
}

// names lists the set's bars for the reject log: its layers, and what lies
// beside the web.
func (b *barSet) names() (out [MaxLayers]LayerBars, beside LayerBars) {
	if b.flange.count > 0 {
		beside.Size[0], beside.Count[0] = b.flange.size.Name, b.flange.count
	}
	for i := range b.layers[:b.used] {
		for j, g := range b.layers[i] {
			if g.count > 0 {
				out[i].Size[j], out[i].Count[j] = g.size.Name, g.count
			}
		}
	}
	return out, beside
}

// appendLayers gives the set to package bars. The groups of the layers stand
// in groups, which must have room for them.
func (b *barSet) appendLayers(dst []bars.Layer, groups []bars.Group) []bars.Layer {
	groups = groups[:0]
	for i := range b.layers[:b.used] {
		first := len(groups)
		for _, g := range b.layers[i] {
			if g.count > 0 {
				groups = append(groups, bars.Group{Size: *g.size, Count: g.count})
			}
		}
		dst = append(dst, groups[first:len(groups):len(groups)])
	}
	return dst
}

// uniformSets appends every set of one size with at least fewest bars that
// fits into layers of most bars: a layer is filled before the next is begun,
// as far as upper bars can lie above lower ones symmetrically.
func uniformSets(dst []barSet, size *bars.Size, fewest, most, layers int) []barSet {
	for n := max(fewest, 2); n <= most*layers; n++ {
		split, ok := splitLayers(n, most, layers)
		if !ok {
			continue
		}
		b := barSet{sizes: 1}
		for i, k := range split {
			b.add(i, size, k)
		}
		dst = append(dst, b)
	}
	return dst
}

// splitLayers shares n bars among layers, the lowest fullest. An odd upper
// layer needs a middle bar below it.
func splitLayers(n, most, layers int) (split [MaxLayers]int, ok bool) {
	below := most
	for i := range layers {
		k := min(n, below)
		if rest := n - k; rest > 0 {
			// The layers above can be odd only over an odd layer.
			if k%2 == 0 && oddAbove(rest, k, layers-i-1) {
				k--
			}
		}
		if i > 0 && k%2 == 1 && split[i-1]%2 == 0 {
			return split, false
		}
		split[i] = k
		n -= k
		below = k
		if n == 0 {
			return split, true
		}
		if k < 1 {
			return split, false
		}
	}
	return split, false
}

// oddAbove reports whether rest bars over a layer of k need an odd layer
// somewhere: they do if rest is odd.
func oddAbove(rest, k, layers int) bool { return layers > 0 && k > 0 && rest%2 == 1 }

// mixedSets appends sets of two neighbouring sizes: an even number of the
// larger one outermost in the first layer with the smaller between, no more
// in all than of the smaller alone would fit, or the larger one below and the
// smaller above.
func mixedSets(dst []barSet, larger, smaller *bars.Size, least units.Area, mostLarger, mostSmaller, layers int) []barSet {
	enough := func(a, b int) bool {
		return !larger.Area.Scale(float64(a)).Add(smaller.Area.Scale(float64(b + 1))).Less(least)
	}
	for a := 2; a <= mostLarger && a < mostSmaller; a += 2 {
		for b := 1; a+b <= mostSmaller; b++ {
			if !enough(a, b) {
				continue
			}
			s := barSet{sizes: 2}
			s.add(0, larger, a)
			s.add(0, smaller, b)
			dst = append(dst, s)
		}
	}
	if layers < 2 {
		return dst
	}
	for a := 2; a <= mostLarger; a++ {
		for b := 2 - a%2; b <= a; b++ {
			if a%2 == 0 && b%2 == 1 || !enough(a, b) {
				continue
			}
			s := barSet{sizes: 2}
			s.add(0, larger, a)
			s.add(1, smaller, b)
			dst = append(dst, s)
		}
	}
	return dst
}

// sortSets puts light sets first, and among equals the one with fewer bars, in
// fewer layers, closer together over web and flange.
func sortSets(sets []barSet) {
	slices.SortStableFunc(sets, func(a, b barSet) int {
		return cmp.Or(cmp.Compare(a.mass, b.mass), cmp.Compare(a.count, b.count), cmp.Compare(a.used, b.used), cmp.Compare(a.widest, b.widest))
	})
}

// flangeRoom is the room for bars in the flange beside the web at a face.
type flangeRoom struct {
	sides int          // of the web that have a flange: 0 to 2
	web   units.Length // between the outermost bars of the web
	reach units.Length // on each side from the outermost bar of the web to the last that a flange bar may lie
	least units.Length // between bars
}

// mostBeside is the most bars that the search puts into the flange on each side.
const mostBeside = 12

// withFlange replaces sets, all of one size, by sets with bars of a size in the
// flange beside the web too, evenly over the room there is, at spacings that
// are multiples of a step where that is not too coarse. Of sets with as many
// bars in all and as many above the first layer, it makes the one whose widest
// distance between neighbours is least: they weigh the same and bend the same.
// Those that come to less than an area, for want of more than one bar a side,
// are left out.
func (r flangeRoom) withFlange(sets []barSet, size *bars.Size, least units.Area, step units.Length) []barSet {
	if r.sides == 0 {
		return sets
	}
	type like struct{ count, upper int }
	at := make(map[like]int)
	var out []barSet
	for i := range sets {
		for m := 1; m <= mostBeside; m++ {
			spacing := r.reach.Scale(1 / float64(m))
			if even := step.Scale(math.Floor(spacing.Ratio(step) + 1e-9)); !even.Less(step) && !even.Less(r.least) {
				spacing = even
			}
			if !r.least.AtMost(spacing) {
				break
			}
			b := sets[i]
			upper := b.count - b.inLayer(0)
			b.beside(size, m*r.sides, spacing)
			b.widest = spacing.Max(r.web.Scale(1 / float64(b.inLayer(0)-1))).In(units.Metre)
			if b.area.Add(size.Area.Scale(float64(r.sides))).Less(least) {
				continue
			}
			k, found := at[like{b.count, upper}]
			switch {
			case !found:
				at[like{b.count, upper}] = len(out)
				out = append(out, b)
			case b.widest < out[k].widest:
				out[k] = b
			}
		}
	}
	if len(out) == 0 {
		return sets
	}
	return out
}
