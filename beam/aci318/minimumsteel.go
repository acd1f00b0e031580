package aci318

import (
	"math"

	"soffit.example/beam"
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
	root, fy, depth float64
	minimumWidth
	capped          bool    // fy is the cap, not the bars' own
	byRoot, byFloor float64 // expressions (a) and (b)
	area            float64 // the greater
}

// minimumWidth is the width that stands for bw in 9.6.1.2, in the units of the
// edition: that of the web; but of a statically determinate beam with its flange
// in tension the lesser of bf and 2bw.
type minimumWidth struct {
	web, face float64 // bw, and the width of the tension face
	flanged   bool    // the second case
	width     float64
}

// minimumWidth takes the face in tension for a flange wherever it is wider than
// the web, of a polygon than the strip that runs through it.
func (e *edition) minimumWidth(web, face units.Length, determinate bool) minimumWidth {
	w := minimumWidth{web: e.lengthIn(web), face: e.lengthIn(face)}
	w.width = w.web
	if determinate && !units.AtMost(w.face, w.web) {
		w.flanged, w.width = true, math.Min(w.face, 2*w.web)
	}
	return w
}

// problemWidth is the minimumWidth of a problem for one sense of bending.
func (e *edition) problemWidth(p *beam.Problem, s beam.Sense) minimumWidth {
	return e.minimumWidth(p.Brief.Section.Width, p.Geometry.FaceWidth(s.TensionFace()), determinate(&p.Brief))
}

// steps writes how the width comes about.
func (m *minimumWidth) steps(e *edition, w *working) {
	if !m.flanged {
		w.given("b", "width of the web", "", e.asLength(m.web))
		if !units.AtMost(m.face, m.web) {
			w.note("the flange is in tension, of a statically indeterminate beam")
		}
		return
	}
	w.given("bw", "width of the web", "", e.asLength(m.web))
	w.given("bf", "width of the flange", "", e.asLength(m.face))
	w.find("b", "width by which least steel goes", "9.6.1.2", "min(bf, 2 bw)", e.asLength(m.width))
	w.note("the flange is in tension, of a statically determinate beam")
}

// minimumSteel evaluates 9.6.1.2.
func (e *edition) minimumSteel(strength, yield units.Stress, width minimumWidth, depth units.Length) minimumSteel {
	r := &e.minimum
	m := minimumSteel{
		root: e.sqrtStrength(strength), fy: e.stressIn(yield),
		minimumWidth: width, depth: e.lengthIn(depth),
	}
	if r.mostYield > 0 && !units.AtMost(m.fy, r.mostYield) {
		m.fy, m.capped = r.mostYield, true
	}
	m.byRoot = r.root * m.root / m.fy * m.width * m.depth
	m.byFloor = r.floor / m.fy * m.width * m.depth
	m.area = math.Max(m.byRoot, m.byFloor)
	return m
}

// steelSteps writes the working; f'c, fy, b and d are given before.
func (m *minimumSteel) steelSteps(e *edition, w *working) {
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
