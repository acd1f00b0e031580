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

// form is the zone's stirrups as package bars knows them.
func (z *Zone) form() bars.StirrupForm {
	if z.Open() {
		return bars.OpenForm
	}
	return bars.ClosedForm
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
	var sizes []bars.Size // of every row
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
				sizes = append(sizes, size)
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
		sizes = append(sizes, size)
	}
	stirrup := t.setZones(&f, l)
	for k, layers := range faces {
		for i := range layers {
			if len(layers[i]) == 0 {
				f.add("/layout/longitudinal", "layers numbered from the face without a gap", "the %s has bars in layer %d and none in layer %d", Face(k+1), len(layers), i+1)
				continue
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
	if len(sizes) == 0 {
		sizes = make([]bars.Size, 1) // no bar asks for more than the stirrup
	}
	t.enclose(stirrup, sizes...)
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
