package aci318

import (
	"soffit.example/beam"
	"soffit.example/units"
)

// tieRules are the limits of 9.7.6.4 on the stirrups that tie bars relied on
// in compression, in the unit of length of an edition.
type tieRules struct {
	bars     float64 // diameters of the smallest bar, 9.7.6.4.3
	stirrups float64 // diameters of the stirrup
	held     float64 // clear distance from a bar in a corner, 9.7.6.4.4
}

var (
	tiesUS = tieRules{bars: 16, stirrups: 48, held: 6}
	tiesSI = tieRules{bars: 16, stirrups: 48, held: 150}
)

// Bar numbers of 9.7.6.4.2: No. 3 ties hold bars up to No. 10, No. 4 larger
// ones and bundles.
const (
	smallTie, largeTie = 3, 4
	smallTied          = 10
)

// judgeTies appends the checks of 9.7.6.4 for a face whose bars are relied on
// in compression. The region where they are needed is taken to be the whole
// beam, so that a length without stirrups fails.
func (e *edition) judgeTies(dst []beam.Check, t *beam.Trial) []beam.Check {
	for _, face := range [2]beam.Face{beam.Bottom, beam.Top} {
		f := t.Steel(face)
		if !f.InCompression || f.Count == 0 {
			continue
		}
		dst = e.appendTieSize(dst, t, f)
		dst = e.appendTieSpacing(dst, t, f)
		dst = e.appendTieForm(dst, t, f)
		dst = e.appendHeldBars(dst, t, f)
	}
	return dst
}

func (e *edition) appendTieSize(dst []beam.Check, t *beam.Trial, f *beam.FaceSteel) []beam.Check {
	need := smallTie
	if largest := f.Largest.Single(); barNumber(largest.Diameter) > smallTied || hasBundles(f) {
		need = largeTie
	}
	least := 0
	for k := range t.ZoneBar {
		if n := barNumber(t.ZoneBar[k].Diameter); k == 0 || n < least {
			least = n
		}
	}
	c := beam.Check{ID: "ties.size", Clause: "9.7.6.4.2", Face: f.Face}
	c.Compare(units.Plain(float64(need)), units.Plain(float64(least)))
	return append(dst, c)
}

// hasBundles reports whether some bars of a face are bundled.
func hasBundles(f *beam.FaceSteel) bool {
	for i := range f.Rows {
		if f.Rows[i].Size.Bundled() > 1 {
			return true
		}
	}
	return false
}

// smallestBar is the diameter of the smallest single bar inside the stirrups of a
// face.
func smallestBar(f *beam.FaceSteel) units.Length {
	least := f.Smallest.Single().Diameter
	for i := range f.Rows {
		if r := &f.Rows[i]; !r.Flange {
			least = least.Min(r.Size.Single().Diameter)
		}
	}
	return least
}

// appendTieSpacing compares the widest distance between stirrups, across what
// the zones leave out too.
func (e *edition) appendTieSpacing(dst []beam.Check, t *beam.Trial, f *beam.FaceSteel) []beam.Check {
	r := &e.ties
	c := beam.Check{ID: "ties.spacing", Clause: "9.7.6.4.3", Face: f.Face}
	section := &t.Brief.Section
	most := smallestBar(f).Scale(r.bars).Min(section.Width).Min(section.Depth)
	var widest, tie units.Length
	for k := range t.Zones {
		if k == 0 || t.ZoneBar[k].Diameter.Less(tie) {
			tie = t.ZoneBar[k].Diameter
		}
		widest = widest.Max(t.Zones[k].Spacing)
	}
	if len(t.Zones) > 0 {
		most = most.Min(tie.Scale(r.stirrups))
	}
	if bare := widestGap(t); len(t.Zones) == 0 || widest.Less(bare) {
		widest = widest.Max(bare)
		c.Reason = "the stirrups are furthest apart where no zone of the layout reaches"
	}
	c.Compare(widest.Amount(), most.Amount())
	if len(t.Zones) == 0 {
		c.Outcome, c.Utilization = beam.Fail, beam.NoCapacity
	}
	if t.Record && len(t.Zones) > 0 {
		var out working
		out.given("db", "diameter of the smallest bar in compression", "", e.asLength(e.lengthIn(smallestBar(f))))
		out.given("dst", "diameter of the stirrups", "", e.asLength(e.lengthIn(tie)))
		out.given("b", "width", "", e.asLength(e.lengthIn(section.Width)))
		out.given("h", "overall depth", "", e.asLength(e.lengthIn(section.Depth)))
		out.find("s,max", "greatest spacing of ties", "9.7.6.4.3",
			"min("+number(r.bars)+" db, "+number(r.stirrups)+" dst, b, h)", e.asLength(e.lengthIn(most)))
		out.given("s", "widest spacing", "", e.asLength(e.lengthIn(widest)))
		c.Steps = out.steps
	}
	return append(dst, c)
}

// widestGap is the greatest distance of stirrups across a length between the
// support faces of a span that no zone reaches.
func widestGap(t *beam.Trial) (widest units.Length) {
	for span := 1; span <= t.Forces.Spans(); span++ {
		s := newShearSpan(t, span)
		for at := s.left; s.clearlyLess(at, s.right); {
			end, covered := s.cover(at)
			if !covered {
				widest = widest.Max(s.apart(at, end))
			}
			at = end
		}
	}
	return widest
}

func (e *edition) appendTieForm(dst []beam.Check, t *beam.Trial, f *beam.FaceSteel) []beam.Check {
	open := 0
	for k := range t.Zones {
		if t.Zones[k].Open() {
			open++
		}
	}
	c := beam.Check{ID: "ties.form", Clause: "9.7.6.4.1", Face: f.Face}
	c.Compare(units.Plain(float64(open)), units.Plain(0))
	if open > 0 {
		c.Reason = "stirrups that tie bars in compression must be closed"
	}
	return append(dst, c)
}

// appendHeldBars asks that corner and alternate bars lie in a corner of a
// stirrup, and that no bar is further than the limit from one that does. Legs
// between the outer two hold a bar each where it helps most, so that bars of
// the outer layer stand alone between held ones; bars of inner layers between
// the legs are held by nothing.
func (e *edition) appendHeldBars(dst []beam.Check, t *beam.Trial, f *beam.FaceSteel) []beam.Check {
	c := beam.Check{ID: "ties.held-bars", Clause: "9.7.6.4.4", Face: f.Face}
	legs := 0
	for k := range t.Zones {
		if n := t.Zones[k].Legs; k == 0 || n < legs {
			legs = n
		}
	}
	inner := outerBars(f) - 2
	for i := 1; i < len(f.Fit.Layers); i++ {
		if n := f.Fit.Layers[i].Count; n > 2 || n == 1 {
			c.Outcome, c.Utilization = beam.Fail, beam.NoCapacity
			c.Reason = "bars of an inner layer, away from the legs, are held by no stirrup"
			return append(dst, c)
		}
	}
	if need := max(inner, 0)/2 + 2; legs < need {
		c.Reason = "alternate bars need a corner of a stirrup each: legs required and provided"
		c.Compare(units.Plain(float64(need)), units.Plain(float64(legs)))
		return append(dst, c)
	}
	var widest units.Length
	if inner > legs-2 { // some bar of the outer layer is not in a corner
		widest = widestClear(f, 1)
	}
	if len(f.Fit.Layers) > 1 {
		widest = widest.Max(alongLeg(f))
	}
	c.Compare(widest.Amount(), e.lengthOf(e.ties.held).Amount())
	return append(dst, c)
}

// widestClear is the greatest clear distance between neighbours of a layer.
func widestClear(f *beam.FaceSteel, layer int) (widest units.Length) {
	for i := 1; i < len(f.Fit.Bars); i++ {
		a, b := &f.Fit.Bars[i-1], &f.Fit.Bars[i]
		if a.Layer == layer && b.Layer == layer {
			widest = widest.Max(clearBetween(a, b))
		}
	}
	return widest
}

// alongLeg is the clear distance along a leg from the corner bar to the
// highest bar beside it.
func alongLeg(f *beam.FaceSteel) units.Length {
	first, last := &f.Fit.Bars[0], &f.Fit.Bars[len(f.Fit.Bars)-1]
	return last.Y.Sub(first.Y).Sub(first.Size.Diameter.Add(last.Size.Diameter).Scale(0.5))
}
