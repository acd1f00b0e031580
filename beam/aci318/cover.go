package aci318

import (
	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/units"
)

// coverRules is the cover table for cast-in-place nonprestressed concrete
// (Table 20.6.1.3.1 of 318-14, Table 20.5.1.3.1 of 318-19), its rows for beams,
// in the unit of length of an edition.
type coverRules struct {
	ground       float64 // cast against and permanently in contact with ground
	weatherLarge float64 // exposed to weather or in contact with ground, No. 6 and larger
	weatherSmall float64 // No. 5 and smaller
	interior     float64 // not exposed: primary bars, stirrups, ties
	bundle       float64 // of a bundle: its equivalent diameter, but no more than this

	clause, bundleClause string
}

// smallCover is the largest bar number with the lesser cover in weather.
const smallCover = 5

var (
	cover14US = coverRules{ground: 3, weatherLarge: 2, weatherSmall: 1.5, interior: 1.5, bundle: 2, clause: "Table 20.6.1.3.1", bundleClause: "20.6.1.3.4"}
	cover14SI = coverRules{ground: 75, weatherLarge: 50, weatherSmall: 40, interior: 40, bundle: 50, clause: "Table 20.6.1.3.1", bundleClause: "20.6.1.3.4"}
	cover19US = coverRules{ground: 3, weatherLarge: 2, weatherSmall: 1.5, interior: 1.5, bundle: 2, clause: "Table 20.5.1.3.1", bundleClause: "20.5.1.3.5"}
	cover19SI = coverRules{ground: 75, weatherLarge: 50, weatherSmall: 40, interior: 40, bundle: 50, clause: "Table 20.5.1.3.1", bundleClause: "20.5.1.3.5"}
)

// leastCover is the clear cover that a bar of its own size needs. A bundle needs
// that of its bars, and its equivalent diameter as far as the limit.
func (e *edition) leastCover(x beam.Exposure, bar *bars.Size) units.Length {
	if bar.Bundled() > 1 {
		single := bar.Single()
		return e.leastCover(x, &single).Max(bar.Diameter.Min(e.lengthOf(e.cover.bundle)))
	}
	r := &e.cover
	switch {
	case x == beam.Ground:
		return e.lengthOf(r.ground)
	case x == beam.Weather && barNumber(bar.Diameter) > smallCover:
		return e.lengthOf(r.weatherLarge)
	case x == beam.Weather:
		return e.lengthOf(r.weatherSmall)
	}
	return e.lengthOf(r.interior)
}

// Cover is the clear cover to the stirrups, or to the bars where there are
// none, with which stirrup and bar each have the cover of their own size.
func (c Code) Cover(p *beam.Problem, stirrup, bar bars.Size) units.Length {
	main := c.e.leastCover(p.Brief.Exposure, &bar)
	if stirrup.Diameter.IsZero() {
		return main
	}
	return c.e.leastCover(p.Brief.Exposure, &stirrup).Max(main.Sub(stirrup.Diameter))
}

// noteOwnCover is said where the brief's own cover is less than the table's.
const noteOwnCover = "the brief asks for less cover than the table: whether that is permitted is not judged"

// ownCover reports whether the brief sets a cover below the least that the
// table has for its exposure, whatever the size of the bars: that is the
// engineer's decision, and no cover is judged. One that only large bars fall
// short of is no decision but a choice of bars, and fails.
func (e *edition) ownCover(t *beam.Trial) bool {
	own := t.Brief.Cover
	return !own.IsZero() && !e.leastCover(t.Brief.Exposure, &bars.Size{}).AtMost(own)
}

// coverCheck compares a cover with the least.
func (e *edition) coverCheck(id string, t *beam.Trial, least, cover units.Length) beam.Check {
	c := beam.Check{ID: id, Clause: e.cover.clause}
	c.Compare(least.Amount(), cover.Amount())
	if c.Outcome == beam.Fail && e.ownCover(t) {
		c.Outcome, c.Reason = beam.NotJudged, noteOwnCover
	}
	if t.Record {
		var out working
		out.given("c,min", "least clear cover for this exposure and size", e.cover.clause, e.asLength(e.lengthIn(least)))
		out.given("c", "clear cover provided", "", e.asLength(e.lengthIn(cover)))
		c.Steps = out.steps
	}
	return c
}

// appendCover appends the cover of the stirrups and of the bars of each face.
func (e *edition) appendCover(dst []beam.Check, t *beam.Trial) []beam.Check {
	if !t.Stirrup.Diameter.IsZero() {
		dst = append(dst, e.coverCheck("cover.stirrup", t, e.leastCover(t.Brief.Exposure, &t.Stirrup), t.Cover))
	}
	for _, face := range [2]beam.Face{beam.Bottom, beam.Top} {
		f := t.Steel(face)
		var least, cover units.Length
		worst := -1.0
		take := func(size *bars.Size, clear units.Length) {
			need := e.leastCover(t.Brief.Exposure, size)
			if u := ratio(need.In(units.Metre), clear.In(units.Metre)); u > worst {
				worst, least, cover = u, need, clear
			}
		}
		for i := range f.Fit.Bars {
			b := &f.Fit.Bars[i]
			half, towards, _ := b.Size.Extent()
			side := b.X.Min(t.Brief.Section.Width.Sub(b.X)).Sub(half)
			take(&b.Size, side.Min(b.Y.Sub(towards)))
		}
		for i := range f.Flange {
			b := &f.Flange[i]
			take(&b.Size, flangeCover(t, face, b))
		}
		if worst < 0 {
			continue
		}
		c := e.coverCheck("cover.bar", t, least, cover)
		c.Face = face
		if f.Largest.Bundled() > 1 || f.Smallest.Bundled() > 1 {
			c.Clause = e.cover.clause + ", " + e.cover.bundleClause
		}
		dst = append(dst, c)
	}
	if t.Side.Each > 0 {
		c := e.coverCheck("cover.bar", t, e.leastCover(t.Brief.Exposure, &t.Side.Size), barCover(t))
		c.Face = beam.Side
		dst = append(dst, c)
	}
	return dst
}

// flangeCover is the clear cover of a bar in a flange: to its face, to the
// flange's other face, and to the end of a flange that ends in the open. A slab
// goes on.
func flangeCover(t *beam.Trial, face beam.Face, b *beam.FlangeBar) units.Length {
	s := &t.Brief.Section
	clear := b.Y.Min(s.FlangeThickness.Sub(b.Y))
	if s.Isolated || s.Shape == beam.InvertedTee {
		left, right := s.Overhangs(face)
		clear = clear.Min(b.X.Add(left)).Min(s.Width.Add(right).Sub(b.X))
	}
	return clear.Sub(b.Size.Diameter.Scale(0.5))
}

// barCover is the clear cover to bars that lie against the stirrups.
func barCover(t *beam.Trial) units.Length { return t.Cover.Add(t.Stirrup.Diameter) }
