package aci318

import (
	"soffit.example/beam"
	"soffit.example/units"
)

// judgeFitting appends the checks on how bars lie: cover, clear distances,
// layers, aggregate, and bars in the corners of the stirrups.
func (e *edition) judgeFitting(dst []beam.Check, t *beam.Trial) []beam.Check {
	dst = e.appendCover(dst, t)
	c := beam.Check{ID: "aggregate.form-width", Clause: "26.4.2.1(a)"}
	c.Compare(t.Brief.Concrete.Aggregate.Amount(), largestStone(t).Amount())
	dst = append(dst, c)
	for _, face := range [2]beam.Face{beam.Bottom, beam.Top} {
		f := t.Steel(face)
		if f.Count > 0 {
			dst = e.appendGaps(dst, t, face)
			dst = e.appendBundles(dst, t, face)
		}
		if !t.Stirrup.Diameter.IsZero() {
			c := beam.Check{ID: "bars.corners", Clause: "25.7.1.2", Face: face}
			c.Compare(units.Plain(corners), units.Plain(float64(outerBars(f))))
			dst = append(dst, c)
		}
	}
	return dst
}

// corners is the number of bends of a stirrup at a face, each with a bar in it.
const corners = 2

// largestStone is the largest aggregate that the forms and a slab allow: the
// narrowest dimension between forms is the web, or a wall beside a hollow.
func largestStone(t *beam.Trial) units.Length {
	g := &t.Geometry
	narrow := g.Web
	if g.Hollow {
		narrow = narrow.Min(g.SideWall).Min(g.TopWall).Min(g.BottomWall)
	}
	most := narrow.Scale(stoneToForm)
	if t.Brief.Section.Flange() == beam.Top {
		most = most.Min(t.Brief.Section.FlangeThickness.Scale(stoneToSlab))
	}
	return most
}
