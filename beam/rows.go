package beam

import (
	"fmt"

	"soffit.example/bars"
	"soffit.example/units"
)

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
