package aci318

import (
	"math"

	"soffit.example/units"
)

// minimumRules are the coefficients of 9.6.1.
type minimumRules struct {
	root  float64 // of √f'c/fy, 9.6.1.2(a)
	floor float64 // over fy, 9.6.1.2(b)
	// mostYield caps fy in both expressions (9.6.1.2 of 318-19); zero: no cap.
	mostYield float64
	waiver    float64 // times the steel required by analysis, 9.6.1.3
}

var (
	minimum14US = minimumRules{root: 3, floor: 200, waiver: 4.0 / 3}
	minimum14SI = minimumRules{root: 0.25, floor: 1.4, waiver: 4.0 / 3}
	minimum19US = minimumRules{root: 3, floor: 200, mostYield: 80000, waiver: 4.0 / 3}
	minimum19SI = minimumRules{root: 0.25, floor: 1.4, mostYield: 550, waiver: 4.0 / 3}
)

// minimumSteel is As,min of 9.6.1.2 in every step, in the units of the edition.
type minimumSteel struct {
	root, fy, width, depth float64
	capped                 bool    // fy is the cap, not the bars' own
	byRoot, byFloor        float64 // expressions (a) and (b)
	area                   float64 // the greater
}

// minimumSteel evaluates 9.6.1.2 for a rectangle, or a web that is as wide as
// its tension face.
func (e *edition) minimumSteel(strength, yield units.Stress, width, depth units.Length) minimumSteel {
	r := &e.minimum
	m := minimumSteel{
		root: e.sqrtStrength(strength), fy: e.stressIn(yield),
		width: e.lengthIn(width), depth: e.lengthIn(depth),
	}
	if r.mostYield > 0 && !units.AtMost(m.fy, r.mostYield) {
		m.fy, m.capped = r.mostYield, true
	}
	m.byRoot = r.root * m.root / m.fy * m.width * m.depth
	m.byFloor = r.floor / m.fy * m.width * m.depth
	m.area = math.Max(m.byRoot, m.byFloor)
	return m
}

// steps writes the working; f'c, fy, b and d are given before.
func (m *minimumSteel) steps(e *edition, w *working) {
	fy := "fy"
	if m.capped {
		fy = "fy,min"
		w.given(fy, "yield strength as it may be used for least steel", "9.6.1.2", e.asStress(m.fy))
		w.note("the bars' own yield strength is above this cap")
	}
	r := &e.minimum
	w.find("As,a", "least steel by concrete strength", "9.6.1.2(a)", "("+number(r.root)+" √f'c / "+fy+") b d", e.asArea(m.byRoot))
	w.find("As,b", "least steel whatever the concrete", "9.6.1.2(b)", "("+number(r.floor)+" / "+fy+") b d", e.asArea(m.byFloor))
	w.find("As,min", "least steel", "9.6.1.2", "max(As,a, As,b)", e.asArea(m.area))
}
