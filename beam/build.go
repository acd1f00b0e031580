package beam

import (
	"cmp"
	"fmt"
	"slices"

	"soffit.example/bars"
	"soffit.example/units"
)

// stirrupLength is the cut length of one set of stirrups of a zone, with its
// cross ties; zero where the section has no room for the bends, which
// appendGeometry reports.
func (t *Trial) stirrupLength(size bars.Size, z *Zone) units.Length {
	cage := t.cage()
	width, depth := cage.Outside()
	l, err := bars.StirrupSet{Size: size, Form: z.form(), Width: width, Depth: depth, Legs: z.Legs, Angle: z.Angle}.Lengths()
	if err != nil {
		return units.Length{}
	}
	return l.Total
}

// form is the zone's stirrups as package bars knows them; closed unless the
// layout says otherwise.
func (z *Zone) form() bars.StirrupForm {
	if z.Form == bars.OpenForm.String() {
		return bars.OpenForm
	}
	return bars.ClosedForm
}

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

// appendChecks appends everything that is judged of a finished trial: the
// geometry, and every group of the code.
func (t *Trial) appendChecks(dst []Check) []Check {
	dst = t.appendGeometry(dst)
	for _, g := range Groups() {
		dst = t.Code.Judge(dst, g, t)
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
		width := t.Brief.Section.Width
		c := Check{ID: "fit.flange", Clause: clause, Face: face, Detailing: true}
		beside := Check{ID: "fit.beside-web", Clause: clause, Face: face, Detailing: true}
		var worstNeed, worstRoom, nearest, radius units.Length
		for i := range f.Flange {
			b := &f.Flange[i]
			out, room := b.X.Neg(), left
			if width.Scale(0.5).Less(b.X) {
				out, room = b.X.Sub(width), right
			}
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
	c.Compare(units.Plain(float64(t.standingInHollows(t.ZoneBar[i].Diameter, z.Legs))), units.Plain(0))
	if c.Outcome == Fail {
		c.Reason = "legs between the outer two stand in a hollow of the section or too near it"
	}
	return c, true
}

// standingInHollows counts the legs between the outer two that do.
func (t *Trial) standingInHollows(diameter units.Length, legs int) (n int) {
	if len(t.Geometry.Hollows) == 0 {
		return 0
	}
	edge := t.Cover.Add(diameter.Scale(0.5))
	between := t.Brief.Section.Width.Sub(edge.Scale(2)).Scale(1 / float64(legs-1))
	for k := 1; k < legs-1; k++ {
		x := edge.Add(between.Scale(float64(k)))
		for _, h := range t.Geometry.Hollows {
			if h[0].Sub(edge).Less(x) && x.Less(h[1].Add(edge)) {
				n++
				break
			}
		}
	}
	return n
}

// layoutOf writes a found layout as a drawing would.
func (s *search) layoutOf(f *found) Layout {
	var l Layout
	length := s.p.length()
	l.appendRows(Bottom, &f.bottom, f.inCompress == Bottom, "B", length)
	l.appendRows(Top, &f.top, f.inCompress == Top, "T", length)
	marks := map[string]string{}
	for _, z := range f.zones {
		like := fmt.Sprintf("%s/%d", z.Bar, z.Legs)
		if marks[like] == "" {
			marks[like] = fmt.Sprintf("S%d", len(marks)+1)
		}
		z.Mark = marks[like]
		l.Transverse = append(l.Transverse, z)
	}
	return l
}

// appendRows adds the bars of one face, marked letter by letter.
func (l *Layout) appendRows(face Face, b *barSet, inCompression bool, letter string, length units.Length) {
	n := 0
	for i := range b.layers[:b.used] {
		for _, g := range b.layers[i] {
			if g.count == 0 {
				continue
			}
			n++
			l.Longitudinal = append(l.Longitudinal, Row{
				Mark: fmt.Sprintf("%s%d", letter, n), Bar: g.size.Single().Name, Count: g.count * g.size.Bundled(), Face: face, Layer: i + 1,
				InCompression: inCompression, To: length, Start: "straight", End: "straight", Bundled: bundled(g.size),
			})
		}
	}
	if r := &b.flange; r.count > 0 {
		l.Longitudinal = append(l.Longitudinal, Row{
			Mark: fmt.Sprintf("%s%d", letter, n+1), Bar: r.size.Name, Count: r.count, Face: face, Layer: 1,
			Flange: true, Spacing: r.spacing, To: length, Start: "straight", End: "straight",
		})
	}
}

// bundled is what a row says of a size: nothing for single bars.
func bundled(size *bars.Size) int {
	if n := size.Bundled(); n > 1 {
		return n
	}
	return 0
}

// trialOf lays a layout out as a trial. Faults name the fields of the layout
// that make no sense for the problem.
func trialOf(p *Problem, l *Layout) (*Trial, []Fault) {
	f := newFaults(p.System)
	t := &Trial{Problem: p}
	length := p.length()
	var faces [2][]bars.Layer
	var flanges [2][]flangeRow
	var relied [2]bool
	largest := bars.Size{}
	if len(l.Longitudinal) > maxRows || len(l.Transverse) > maxRows {
		f.add("/layout", fmt.Sprintf("at most %d rows and %d zones", maxRows, maxRows), "%d rows and %d zones given", len(l.Longitudinal), len(l.Transverse))
		return nil, f.list
	}
	for i := range l.Longitudinal {
		r := &l.Longitudinal[i]
		path := fmt.Sprintf("/layout/longitudinal/%d", i)
		size, err := p.Catalog.Size(r.Bar)
		if err != nil {
			f.add(path+"/bar", "a size of "+p.Catalog.ID(), "%v", err)
			continue
		}
		if r.Count < 1 || r.Count > mostBars {
			f.add(path+"/count", fmt.Sprintf("1 to %d", mostBars), "count is %d", r.Count)
			continue
		}
		if !r.From.IsZero() || !r.To.IsZero() && !(r.To.AtMost(length) && length.AtMost(r.To)) {
			f.add(path+"/to", "0 and "+p.System.Format(length.Amount()),
				"the row runs from %s to %s; this version judges bars that run the full length", p.System.Format(r.From.Amount()), p.System.Format(r.To.Amount()))
		}
		for _, end := range [2]string{r.Start, r.End} {
			if end != "" && end != "straight" {
				f.add(path, "straight", "a bar end %q is not one that this version judges", end)
			}
		}
		if !r.Yield.IsZero() {
			f.within(path+"/yield", "yield strength", r.Yield.Amount(), f.leastYield.Amount(), f.mostYield.Amount())
		}
		switch r.Face {
		case Bottom, Top:
		case Side:
			if t.Side.Each > 0 {
				f.add(path, "one row of side bars", "a second row of side bars is given")
				continue
			}
			if r.Layer != 0 || r.Flange || r.Bundled > 1 || r.InCompression {
				f.add(path, "bars, count, spacing and yield", "a row of side bars is given what belongs to rows of a face: a layer, a flange, bundles or compression")
			}
			t.Side = SideSteel{Size: size, Each: r.Count, Spacing: r.Spacing, Yield: r.yield(p), TensionFace: Bottom}
			if !(r.Spacing.Amount().SI() > 0) {
				f.add(path+"/spacing", "above zero", "side bars need the distance between them, and it is %s", p.System.Format(r.Spacing.Amount()))
			}
			continue
		default:
			f.add(path+"/face", "bottom, top, side", "face is missing or not known")
			continue
		}
		k := int(r.Face) - 1
		if r.Flange {
			if row, ok := t.flangeRow(&f, path, r, size); ok {
				flanges[k] = append(flanges[k], row)
				t.yields = append(t.yields, rowYield{r.Face, 0, size.Name, r.yield(p)})
				largest = larger(largest, size)
			}
			continue
		}
		if r.Layer < 1 || r.Layer > mostLayers {
			f.add(path+"/layer", fmt.Sprintf("1 to %d", mostLayers), "layer is %d", r.Layer)
			continue
		}
		count := r.Count
		if r.Bundled > 1 {
			if size, count, err = bundle(size, r); err != nil {
				f.add(path+"/bundled", "2 to 4, and a divisor of count", "%v", err)
				continue
			}
		}
		t.yields = append(t.yields, rowYield{r.Face, r.Layer, size.Name, r.yield(p)})
		for len(faces[k]) < r.Layer {
			faces[k] = append(faces[k], nil)
		}
		faces[k][r.Layer-1] = append(faces[k][r.Layer-1], bars.Group{Size: size, Count: count})
		relied[k] = relied[k] || r.InCompression
		largest = larger(largest, size)
	}
	stirrup := t.setZones(&f, l)
	for k, layers := range faces {
		for i := range layers {
			if len(layers[i]) == 0 {
				f.add("/layout/longitudinal", "layers numbered from the face without a gap", "the %s has bars in layer %d and none in layer %d", Face(k+1), len(layers), i+1)
				layers[i] = []bars.Group{{Size: largest, Count: 1}}
			}
			// The order in which groups of a layer are listed is no fact.
			slices.SortStableFunc(layers[i], func(a, b bars.Group) int { return -cmp.Compare(a.Size.Order, b.Size.Order) })
		}
	}
	if len(f.list) > 0 {
		return nil, f.list
	}
	t.oneYield(&f)
	t.setBent(&f, l)
	t.enclose(stirrup, largest)
	for k, layers := range faces {
		if len(layers) == 0 && len(flanges[k]) > 0 {
			f.add("/layout/longitudinal", "bars in the web beside those in the flange", "the %s has bars in the flange and none in the web", Face(k+1))
			continue
		}
		if err := t.lay(Face(k+1), layers, flanges[k], relied[k]); err != nil {
			f.add("/layout/longitudinal", "", "%v", err)
		}
	}
	return t, f.list
}

// bundle is the unit that bars of a size make in contact, and how many units a
// row has.
func bundle(size bars.Size, r *Row) (bars.Size, int, error) {
	if r.Count%r.Bundled != 0 {
		return size, 0, fmt.Errorf("%d bars do not make up bundles of %d", r.Count, r.Bundled)
	}
	unit, err := bars.Bundle(size, r.Bundled)
	return unit, r.Count / r.Bundled, err
}

// yield is the row's own yield strength, or the brief's.
func (r *Row) yield(p *Problem) units.Stress {
	if r.Yield.IsZero() {
		return p.Brief.Reinforcement.Yield
	}
	return r.Yield
}

// oneYield reports bars of one size in one layer with two yield strengths,
// which nobody could tell apart on site either.
func (t *Trial) oneYield(f *faults) {
	for i := range t.yields {
		a := &t.yields[i]
		if y := t.yieldOf(a.face, a.layer, a.bar); y != a.yield {
			f.add("/layout/longitudinal", "one yield strength for each size in a layer", "%s bars of one layer at the %s have two yield strengths", a.bar, a.face)
			return
		}
	}
}

// flangeRow takes a row of bars in a flange.
func (t *Trial) flangeRow(f *faults, path string, r *Row, size bars.Size) (row flangeRow, ok bool) {
	n := len(f.list)
	if left, right := t.Brief.Section.Overhangs(r.Face); left.IsZero() && right.IsZero() {
		f.add(path+"/flange", "a face with a flange", "the section has no flange at the %s", r.Face)
	}
	if !(r.Spacing.Amount().SI() > 0) {
		f.add(path+"/spacing", "above zero", "bars in a flange need the distance between them, and it is %s", t.System.Format(r.Spacing.Amount()))
	}
	if r.Layer > 1 || r.Bundled > 1 {
		f.add(path, "single bars at the level of the first layer", "bars in a flange lie in layer %d, bundles of %d", r.Layer, r.Bundled)
	}
	return flangeRow{size: &size, count: r.Count, spacing: r.Spacing}, len(f.list) == n
}

// setBent takes the bent bars of a layout.
func (t *Trial) setBent(f *faults, l *Layout) {
	if len(l.Bent) > maxRows {
		f.add("/layout/bent", fmt.Sprintf("at most %d", maxRows), "%d groups of bent bars given", len(l.Bent))
		return
	}
	for i := range l.Bent {
		b := l.Bent[i]
		path := fmt.Sprintf("/layout/bent/%d", i)
		size, err := t.Catalog.Size(b.Bar)
		if err != nil {
			f.add(path+"/bar", "a size of "+t.Catalog.ID(), "%v", err)
			continue
		}
		if len(t.Brief.Spans) == 0 {
			f.add(path, "a brief with spans", "bent bars have a place along a span, and demands have none")
			continue
		}
		setIfZero(&b.Span, 1)
		setIfZero(&b.Bends, 1)
		f.count(path+"/count", "count", b.Count, 1, mostBars)
		f.count(path+"/bends", "bends", b.Bends, 1, mostBars)
		f.count(path+"/span", "span", b.Span, 1, len(t.Brief.Spans))
		if !(b.Angle >= leastSlope && b.Angle <= 90) {
			f.add(path+"/angle", fmt.Sprintf("%g to 90 degrees", leastSlope), "angle is %g", b.Angle)
		}
		if b.Rises != "left" && b.Rises != "right" {
			f.add(path+"/rises", "left, right", "rises is %q", b.Rises)
		}
		if b.Bends > 1 && !(b.Spacing.Amount().SI() > 0) {
			f.add(path+"/spacing", "above zero", "groups of bent bars need the distance between them, and it is %s", t.System.Format(b.Spacing.Amount()))
		}
		if b.Span >= 1 && b.Span <= len(t.Brief.Spans) {
			f.within(path+"/at", "place", b.At.Amount(), units.Length{}.Amount(), t.Brief.Spans[b.Span-1].Amount())
		}
		t.Bent, t.BentBar = append(t.Bent, b), append(t.BentBar, size)
	}
}

// leastSlope is the flattest that a bar or a stirrup may lie across the web, in
// degrees; a code may ask for more.
const leastSlope = 15.0

// mostLayers is the most layers that a layout may have at a face.
const mostLayers = 20

const (
	maxRows  = 500
	mostBars = 1000
)

// setZones takes the stirrup zones of a layout and returns the stirrup that
// the bars lie in: the largest of them.
func (t *Trial) setZones(f *faults, l *Layout) bars.Size {
	var stirrup bars.Size
	member := len(t.Brief.Spans) > 0
	for i := range l.Transverse {
		z := l.Transverse[i]
		path := fmt.Sprintf("/layout/transverse/%d", i)
		size, err := t.Catalog.Size(z.Bar)
		if err != nil {
			f.add(path+"/bar", "a size of "+t.Catalog.ID(), "%v", err)
			continue
		}
		if z.Legs < 2 || z.Legs > 20 {
			f.add(path+"/legs", "2 to 20", "legs is %d", z.Legs)
		}
		if !(z.Spacing.Amount().SI() > 0) || f.mostSide.Less(z.Spacing) {
			f.add(path+"/spacing", "above zero, to "+f.system.Format(f.mostSide.Amount()), "spacing is %s", f.system.Format(z.Spacing.Amount()))
			continue
		}
		if z.Angle != 0 && !(z.Angle >= leastSlope && z.Angle <= 90) {
			f.add(path+"/angle", fmt.Sprintf("%g to 90 degrees", leastSlope), "angle is %g", z.Angle)
		}
		if z.Form != "" && z.Form != "closed" && z.Form != "open" {
			f.add(path+"/form", "closed, open", "form is %q", z.Form)
		}
		if member {
			setIfZero(&z.Span, 1)
			if z.Span < 1 || z.Span > len(t.Brief.Spans) {
				f.add(path+"/span", fmt.Sprintf("1 to %d", len(t.Brief.Spans)), "span is %d", z.Span)
				continue
			}
			if span := t.Brief.Spans[z.Span-1]; z.From.Amount().SI() < 0 || !z.To.AtMost(span) || !z.From.Less(z.To) {
				f.add(path+"/to", "a length of the span, from before to", "the zone runs from %s to %s", f.system.Format(z.From.Amount()), f.system.Format(z.To.Amount()))
				continue
			}
			if need := stirrupCount(z); z.Count == 0 {
				z.Count = need
			} else if z.Count < need || z.Count > need+1 {
				f.add(path+"/count", fmt.Sprintf("%d, or %d", need, need+1), "%d stirrups at %s do not make up the zone", z.Count, f.system.Format(z.Spacing.Amount()))
			}
		} else if len(t.Zones) > 0 {
			f.add(path, "one zone with demands", "more than one zone is given, and demands have no place along the beam")
			continue
		}
		t.Zones = append(t.Zones, z)
		t.ZoneBar = append(t.ZoneBar, size)
		if stirrup.IsZero() || stirrup.Diameter.Less(size.Diameter) {
			stirrup = size
		}
	}
	for i := range t.Zones {
		for j := range t.Zones[:i] {
			a, b := &t.Zones[i], &t.Zones[j]
			if a.Span == b.Span && member && !a.To.AtMost(b.From) && !b.To.AtMost(a.From) {
				f.add(fmt.Sprintf("/layout/transverse/%d", i), "zones that do not overlap", "zones %d and %d overlap", j, i)
			}
		}
	}
	return stirrup
}
