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
	l, err := bars.StirrupSet{Size: size, Form: z.form(), Width: width, Depth: depth, Legs: z.Legs}.Lengths()
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
	}
	dst = t.appendSideGeometry(dst)
	for i := range t.Zones {
		// Stirrups stand clear of each other as bars do.
		c := Check{ID: "stirrup.clear", Clause: clause, Span: t.Zones[i].Span, At: t.Zones[i].From, Detailing: true}
		c.Compare(t.ZoneBar[i].Diameter.Add(t.Code.Gaps(t.Problem).InLayer.Least).Amount(), t.Zones[i].Spacing.Amount())
		dst = append(dst, c)

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
				Mark: fmt.Sprintf("%s%d", letter, n), Bar: g.size.Name, Count: g.count, Face: face, Layer: i + 1,
				InCompression: inCompression, To: length, Start: "straight", End: "straight",
			})
		}
	}
}

// trialOf lays a layout out as a trial. Faults name the fields of the layout
// that make no sense for the problem.
func trialOf(p *Problem, l *Layout) (*Trial, []Fault) {
	f := newFaults(p.System)
	t := &Trial{Problem: p}
	length := p.length()
	var faces [2][]bars.Layer
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
		switch r.Face {
		case Bottom, Top:
		case Side:
			if t.Side.Each > 0 {
				f.add(path, "one row of side bars", "a second row of side bars is given")
				continue
			}
			t.Side = SideSteel{Size: size, Each: r.Count, Spacing: r.Spacing, TensionFace: Bottom}
			if !(r.Spacing.Amount().SI() > 0) {
				f.add(path+"/spacing", "above zero", "side bars need the distance between them, and it is %s", p.System.Format(r.Spacing.Amount()))
			}
			continue
		default:
			f.add(path+"/face", "bottom, top, side", "face is missing or not known")
			continue
		}
		if r.Layer < 1 || r.Layer > MaxLayers {
			f.add(path+"/layer", fmt.Sprintf("1 to %d", MaxLayers), "layer is %d", r.Layer)
			continue
		}
		k := int(r.Face) - 1
		for len(faces[k]) < r.Layer {
			faces[k] = append(faces[k], nil)
		}
		faces[k][r.Layer-1] = append(faces[k][r.Layer-1], bars.Group{Size: size, Count: r.Count})
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
	t.enclose(stirrup, largest)
	for k, layers := range faces {
		if err := t.lay(Face(k+1), layers, relied[k]); err != nil {
			f.add("/layout/longitudinal", "", "%v", err)
		}
	}
	return t, f.list
}

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
