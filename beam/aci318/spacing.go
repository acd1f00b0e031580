package aci318

import (
	"math"

	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/units"
)

// spacingRules are the least clear distances of 25.2 and the limits on the
// aggregate of 26.4.2.1(a), in the unit of length of an edition.
type spacingRules struct {
	least    float64 // between bars of a layer, 25.2.1, and between layers, 25.2.2
	diameter float64 // of the bar, 25.2.1
	stone    float64 // of the aggregate, 25.2.1
}

var (
	spacingUS = spacingRules{least: 1, diameter: 1, stone: 4.0 / 3}
	spacingSI = spacingRules{least: 25, diameter: 1, stone: 4.0 / 3}
)

// Shares of 26.4.2.1(a) that the aggregate may not exceed.
const (
	stoneToForm = 1.0 / 5 // of the narrowest dimension between sides of forms
	stoneToSlab = 1.0 / 3 // of the depth of a slab
	stoneToGap  = 3.0 / 4 // of the least clear spacing of bars
)

// Gaps are the clear distances of 25.2.1 and 25.2.2, widened where 26.4.2.1(a)
// asks more for the brief's aggregate, so that layers are laid as they pass.
func (c Code) Gaps(p *beam.Problem) bars.Clearances {
	r := &c.e.spacing
	stone := p.Brief.Concrete.Aggregate
	least := c.e.lengthOf(r.least).Max(stone.Scale(1 / stoneToGap))
	return bars.Clearances{
		InLayer:       bars.Clearance{Least: least.Max(stone.Scale(r.stone)), Diameters: r.diameter},
		BetweenLayers: bars.Clearance{Least: least},
	}
}

// Allows reports whether a size may be used so: bars of Table 20.2.1.3 up to
// No. 18 along the beam, bundled up to No. 11 (25.6.1.3), No. 3 to No. 8 as
// stirrups (Table 25.3.2).
func (c Code) Allows(use bars.Use, s bars.Size) bool {
	n := barNumber(s.Single().Diameter)
	if s.Bundled() > 1 {
		return use == bars.Main && leastBar <= n && n <= mostBundledSize && s.Bundled() <= mostBundled
	}
	switch use {
	case bars.Main:
		return leastBar <= n && n <= mostBar
	case bars.Stirrup:
		return leastBar <= n && n <= mostStirrup
	}
	return false
}

// Numbers of the smallest and the largest deformed bar of ASTM A615 and A706.
const (
	leastBar = 3
	mostBar  = 18
)

// barGap is the clear distance between two bars that has least to spare.
type barGap struct {
	found           bool
	clear, required units.Length
	diameter        units.Length // of the larger of the two
}

func (g *barGap) take(h barGap) {
	if !g.found || ratio(h.required.In(units.Metre), h.clear.In(units.Metre)) > ratio(g.required.In(units.Metre), g.clear.In(units.Metre)) {
		*g = h
	}
}

// besideGap is the tightest pair of neighbours in the layers of a face, those in
// its flange among them. Bundles count with the diameter of one bar of their
// area (25.6.1.6).
func (e *edition) besideGap(t *beam.Trial, f *beam.FaceSteel) (g barGap) {
	floor := e.lengthOf(e.spacing.least).Max(t.Brief.Concrete.Aggregate.Scale(e.spacing.stone))
	for i := 1; i < len(f.Fit.Bars); i++ {
		a, b := &f.Fit.Bars[i-1], &f.Fit.Bars[i]
		if a.Layer == b.Layer {
			g.take(e.gapOf(&a.Size, &b.Size, a.Clear(b), floor))
		}
	}
	if len(f.Flange) == 0 {
		return g
	}
	n := nearestTo(f)
	for i := 1; i < n.len(); i++ {
		a, ax, ay, beside := n.at(i - 1)
		b, bx, by, also := n.at(i)
		if !beside && !also {
			continue
		}
		aHalf, _, _ := a.Extent()
		bHalf, _, _ := b.Extent()
		apart := math.Hypot(bx.Sub(ax).In(units.Metre), by.Sub(ay).In(units.Metre))
		g.take(e.gapOf(a, b, units.Metre.Of(apart).Sub(aHalf).Sub(bHalf), floor))
	}
	return g
}

func (e *edition) gapOf(a, b *bars.Size, clear, floor units.Length) barGap {
	larger := a.Diameter.Max(b.Diameter)
	return barGap{true, clear, floor.Max(larger.Scale(e.spacing.diameter)), larger}
}

// clearBetween is the clear distance between two bars.
func clearBetween(a, b *bars.Placed) units.Length { return a.Clear(b) }

// layerGap is the least clear distance between neighbouring layers of a face.
func (e *edition) layerGap(f *beam.FaceSteel) (g barGap) {
	var top units.Length // of the layer below
	for i := range f.Fit.Layers {
		l := &f.Fit.Layers[i]
		row := f.Fit.Bars[l.First : l.First+l.Count]
		low, high := row[0].Y, row[0].Y
		for k := range row {
			_, towards, away := row[k].Size.Extent()
			low, high = low.Min(row[k].Y.Sub(towards)), high.Max(row[k].Y.Add(away))
		}
		if i > 0 {
			g.take(barGap{found: true, clear: low.Sub(top), required: e.lengthOf(e.spacing.least)})
		}
		top = high
	}
	return g
}

// appendGaps appends the clear distances between the bars of a face and what
// they ask of the aggregate.
func (e *edition) appendGaps(dst []beam.Check, t *beam.Trial, face beam.Face) []beam.Check {
	f := t.Steel(face)
	stone := t.Brief.Concrete.Aggregate
	beside, between := e.besideGap(t, f), e.layerGap(f)

	c := beam.Check{ID: "spacing.clear", Clause: "25.2.1", Face: face}
	if beside.found {
		c.Compare(beside.required.Amount(), beside.clear.Amount())
		if t.Record {
			c.Steps = e.gapSteps(&beside, stone)
		}
	} else {
		c.Outcome, c.Reason = beam.NotApplicable, "no two bars lie in one layer"
	}
	dst = append(dst, c)

	if between.found {
		c = beam.Check{ID: "spacing.layers", Clause: "25.2.2", Face: face}
		c.Compare(between.required.Amount(), between.clear.Amount())
		dst = append(dst, c)
		c = beam.Check{ID: "spacing.alignment", Clause: "25.2.2", Face: face}
		astray := 0
		for i := 1; i < len(f.Fit.Layers); i++ {
			if !f.Fit.Layers[i].Aligned {
				astray++
			}
		}
		c.Compare(units.Plain(float64(astray)), units.Plain(0))
		if astray > 0 {
			c.Reason = "bars of an upper layer do not lie directly above bars of the layer below"
		}
		dst = append(dst, c)
	}

	least, found := beside.clear, beside.found
	if between.found && (!found || between.clear.Less(least)) {
		least, found = between.clear, true
	}
	if found {
		c = beam.Check{ID: "aggregate.clear-spacing", Clause: "26.4.2.1(a)", Face: face}
		c.Compare(stone.Amount(), least.Scale(stoneToGap).Amount())
		dst = append(dst, c)
	}
	return dst
}

// Limits of 25.6.1 on bundles, which all editions share.
const (
	mostBundled     = 4  // bars in a bundle, 25.6.1.1
	mostBundledSize = 11 // number of the bars of a bundle in a beam, 25.6.1.3
)

// appendBundles appends what 25.6.1 asks of the bundles of a face.
func (e *edition) appendBundles(dst []beam.Check, t *beam.Trial, face beam.Face) []beam.Check {
	most, largest := 1, 0
	for i := range t.Steel(face).Rows {
		if s := &t.Steel(face).Rows[i].Size; s.Bundled() > 1 {
			single := s.Single()
			most, largest = max(most, s.Bundled()), max(largest, barNumber(single.Diameter))
		}
	}
	if most == 1 {
		return dst
	}
	c := beam.Check{ID: "bundles.bars", Clause: "25.6.1.1", Face: face}
	c.Compare(units.Plain(float64(most)), units.Plain(mostBundled))
	dst = append(dst, c)
	c = beam.Check{ID: "bundles.size", Clause: "25.6.1.3", Face: face}
	c.Compare(units.Plain(float64(largest)), units.Plain(mostBundledSize))
	dst = append(dst, c)
	c = beam.Check{ID: "bundles.enclosed", Clause: "25.6.1.2", Face: face, Reason: "bundles lie inside stirrups: stirrups required and provided"}
	provided := 0.0
	if !t.Stirrup.Diameter.IsZero() {
		provided = 1
	}
	c.Compare(units.Plain(1), units.Plain(provided))
	return append(dst, c)
}

func (e *edition) gapSteps(g *barGap, stone units.Length) []beam.Step {
	r := &e.spacing
	var out working
	out.given("db", "diameter of the larger bar of the closest pair", "", e.asLength(e.lengthIn(g.diameter)))
	out.given("dagg", "nominal maximum size of the aggregate", "", e.asLength(e.lengthIn(stone)))
	out.find("s,min", "least clear distance", "25.2.1",
		"max("+number(r.least)+", db, 4 / 3 dagg)", e.asLength(e.lengthIn(g.required)))
	out.given("s", "clear distance of that pair", "", e.asLength(e.lengthIn(g.clear)))
	return out.steps
}
