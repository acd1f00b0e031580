package beam

import (
	"soffit.example/bars"
	"soffit.example/units"
)

// appendGeometry appends what no code is needed to see: whether the stirrups
// can be bent, and whether the bars lie inside them, clear of those at the
// opposite face.
func (t *Trial) appendGeometry(dst []Check) []Check {
	const clause = "geometry"
	depth := t.Brief.Section.Depth
	for _, face := range [2]Face{Bottom, Top} {
		f := t.Steel(face)
		if f.Count == 0 {
			continue
		}
		c := Check{ID: "fit.width", Clause: clause, Face: face, Detailing: true}
		c.Compare(f.Fit.LeastWidth.Amount(), t.Brief.Section.Width.Amount())
		dst = append(dst, c)

		c = Check{ID: "fit.depth", Clause: clause, Face: face, Detailing: true}
		// Opposite bars keep the distance of layers; without any, the leg of
		// the stirrup is opposite.
		other := t.Cover.Add(t.Stirrup.Diameter)
		if o := t.Steel(face.Opposite()); o.Count > 0 {
			other = o.Fit.Height.Add(t.Code.Gaps(t.Problem).BetweenLayers.Least)
		}
		c.Compare(f.Fit.Height.Add(other).Amount(), depth.Amount())
		dst = append(dst, c)

		// Bars beyond mid-depth are no steel of their face, whatever a layout
		// calls them: bent towards it, they may even be in compression.
		if t.Record || depth.Scale(0.5).Less(f.Fit.Height) {
			c = Check{ID: "fit.half", Clause: clause, Face: face, Detailing: true}
			c.Compare(f.Highest().Amount(), depth.Scale(0.5).Amount())
			dst = append(dst, c)
		}
	}
	dst = t.appendSideGeometry(dst)
	dst = t.appendFlangeGeometry(dst)
	for i := range t.Zones {
		// Stirrups stand clear of each other as bars do.
		c := Check{ID: "stirrup.clear", Clause: clause, Span: t.Zones[i].Span, At: t.Zones[i].From, Detailing: true}
		c.Compare(t.ZoneBar[i].Diameter.Add(t.Code.Gaps(t.Problem).InLayer.Least).Amount(), t.Zones[i].Spacing.Amount())
		dst = append(dst, c)

		if c, hollow := t.hollowLegs(i); hollow {
			dst = append(dst, c)
		}

		c = Check{ID: "stirrup.bends", Clause: clause, Span: t.Zones[i].Span, At: t.Zones[i].From, Detailing: true}
		cage := t.cage()
		width, depth := cage.Outside()
		bend, err := t.ZoneBar[i].Bend(bars.Stirrup)
		if err != nil {
			c.Outcome, c.Utilization, c.Reason = Fail, NoCapacity, err.Error()
			dst = append(dst, c)
			continue
		}
		c.Compare(bend.Setback().Scale(2).Amount(), width.Min(depth).Amount())
		dst = append(dst, c)
	}
	return dst
}

// appendSideGeometry sees whether side-face bars lie between the bars of top
// and bottom, clear of both and of each other.
func (t *Trial) appendSideGeometry(dst []Check) []Check {
	s := &t.Side
	if s.Each == 0 {
		return dst
	}
	const clause = "geometry"
	gap, radius := t.Code.Gaps(t.Problem).InLayer.Least, s.Size.Diameter.Scale(0.5)
	near, far := t.Steel(s.TensionFace), t.Steel(s.TensionFace.Opposite())
	clear := Check{ID: "side-face.clear", Clause: clause, Face: Side, Detailing: true}
	clear.Compare(near.Fit.Height.Sub(near.Farthest).Max(radius).Add(gap).Add(radius).Amount(), s.Spacing.Amount())
	room := Check{ID: "side-face.room", Clause: clause, Face: Side, Detailing: true}
	room.Compare(near.Farthest.Add(s.Spacing.Scale(float64(s.Each))).Add(radius).Add(gap).Add(far.Fit.Height).Amount(), t.Brief.Section.Depth.Amount())
	return append(dst, clear, room)
}

// appendFlangeGeometry sees whether bars in a flange lie inside it, with the
// cover of the stirrups to its edges and its other face, and whether the bars
// of the web keep clear of the section's hollows.
func (t *Trial) appendFlangeGeometry(dst []Check) []Check {
	const clause = "geometry"
	for _, face := range [2]Face{Bottom, Top} {
		f := t.Steel(face)
		if len(f.Flange) == 0 {
			continue
		}
		left, right := t.Brief.Section.Overhangs(face)
		overs := [2]units.Length{left, right}
		c := Check{ID: "fit.flange", Clause: clause, Face: face, Detailing: true}
		beside := Check{ID: "fit.beside-web", Clause: clause, Face: face, Detailing: true}
		var worstNeed, worstRoom, nearest, radius units.Length
		for i := range f.Flange {
			b := &f.Flange[i]
			side, out := t.Beside(b)
			room := overs[side]
			r := b.Size.Diameter.Scale(0.5)
			need := out.Add(r).Add(t.Cover)
			if i == 0 || worstNeed.Sub(worstRoom).Less(need.Sub(room)) {
				worstNeed, worstRoom = need, room
			}
			if i == 0 || out.Sub(r).Less(nearest.Sub(radius)) {
				nearest, radius = out, r
			}
		}
		c.Compare(worstNeed.Amount(), worstRoom.Amount())
		beside.Compare(radius.Amount(), nearest.Amount())
		dst = append(dst, c, beside)

		c = Check{ID: "fit.flange-thickness", Clause: clause, Face: face, Detailing: true}
		highest := units.Length{}
		for i := range f.Flange {
			highest = highest.Max(f.Flange[i].Y.Add(f.Flange[i].Size.Diameter.Scale(0.5)))
		}
		c.Compare(highest.Add(t.Cover).Amount(), t.Brief.Section.FlangeThickness.Amount())
		dst = append(dst, c)
	}
	if g := &t.Geometry; g.Hollow {
		c := Check{ID: "fit.hollow", Clause: clause, Detailing: true}
		inside := t.Cover.Add(t.Stirrup.Diameter)
		if t.Side.Each > 0 {
			inside = inside.Add(t.Side.Size.Diameter)
		}
		c.Compare(inside.Add(t.Cover).Amount(), g.SideWall.Amount())
		dst = append(dst, c)
		for _, face := range [2]Face{Bottom, Top} {
			wall := g.BottomWall
			if face == Top {
				wall = g.TopWall
			}
			if f := t.Steel(face); f.Count > 0 {
				c := Check{ID: "fit.hollow", Clause: clause, Face: face, Detailing: true}
				c.Compare(f.Fit.Height.Add(t.Cover).Amount(), wall.Amount())
				dst = append(dst, c)
			}
		}
	}
	return dst
}

// hollowLegs sees whether the legs of zone i between the outer two, spread
// evenly, stand in the concrete beside the section's hollows, by the stirrups'
// cover. It reports whether there is anything to see.
func (t *Trial) hollowLegs(i int) (c Check, hollow bool) {
	z := &t.Zones[i]
	if len(t.Geometry.Hollows) == 0 || z.Legs <= 2 {
		return c, false
	}
	c = Check{ID: "stirrup.hollow", Clause: "geometry", Span: z.Span, At: z.From, Detailing: true}
	c.Compare(units.Plain(float64(t.standingInHollows(t.ZoneBar[i], z.Legs))), units.Plain(0))
	if c.Outcome == Fail {
		c.Reason = "legs between the outer two stand in a hollow of the section or too near it"
	}
	return c, true
}

// standingInHollows counts the legs between the outer two that do.
func (t *Trial) standingInHollows(stirrup bars.Size, legs int) (n int) {
	if len(t.Geometry.Hollows) == 0 {
		return 0
	}
	cage := t.cage()
	cage.Stirrup = stirrup
	all, _, err := cage.AppendLegs(nil, legs, nil)
	if err != nil {
		return 0 // too narrow for two legs, as other checks say
	}
	edge := t.Cover.Add(stirrup.Diameter.Scale(0.5))
	for _, x := range all[1 : legs-1] {
		for _, h := range t.Geometry.Hollows {
			if h[0].Sub(edge).Less(x) && x.Less(h[1].Add(edge)) {
				n++
				break
			}
		}
	}
	return n
}
