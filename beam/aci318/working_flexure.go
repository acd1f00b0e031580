package aci318

import (
	"strconv"
	"strings"

	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// momentClause is where the critical section of a moment comes from; demands
// bring their own.
func momentClause(t *beam.Trial) string {
	if t.Forces.Spans() == 0 {
		return ""
	}
	return "9.4.2.1"
}

// flexureSteps is the working of φMn for the equilibrium in t.Ultimate.
func (e *edition) flexureSteps(t *beam.Trial, s beam.Sense, f *flexure, moment units.Moment) *working {
	b := &t.Brief
	w := new(working)
	section := e.trialSection(t, s)
	w.given("Mu", "factored moment", momentClause(t), e.asMoment(e.momentIn(moment)))
	e.strengthSteps(w, section, s, &t.Ultimate, b.Concrete.Strength, f)
	e.phiSteps(w, f, b.Readings.RoundedYield)
	w.find("φMn", "design strength", "9.5.1.1", "φ Mn", e.asMoment(e.momentIn(f.design)))
	return w
}

// strengthSteps writes the way to Mn.
func (e *edition) strengthSteps(w *working, section mechanics.Section, s beam.Sense, u *mechanics.Ultimate, strength units.Stress, f *flexure) {
	z := sizing{parts: section.Parts, unit: e.length, height: e.lengthIn(section.Depth()), hogging: s == beam.Negative}
	k := z.blockAt(f.blockFactor * e.lengthIn(u.NeutralAxis))
	meaning := "yield strength of the bars"
	if !oneYield(section) {
		meaning = "greatest yield strength of the steel in tension, which classes it"
	}
	w.given("f'c", "specified concrete strength", "19.2.1", e.asStress(e.stressIn(strength)))
	w.given("fy", meaning, "20.2.2.4", e.asStress(e.stressIn(f.yield)))
	e.blockInputs(w, &k, "b")
	if allYieldInTension(section, u) && oneYield(section) && f.axial.IsZero() {
		e.yieldingSteps(w, section, u, f, &k)
	} else {
		e.layeredSteps(w, section, &z, u, f, strength, &k)
	}
}

// oneYield reports whether all layers have one yield strength.
func oneYield(section mechanics.Section) bool {
	for i := range section.Layers {
		if section.Layers[i].Steel.Yield != section.Layers[0].Steel.Yield {
			return false
		}
	}
	return true
}

// block is where a stress block ends: in a strip that begins at x, where it is w
// wide and widens by slope; with the concrete above that strip and the first
// moment of that about the compression face.
type block struct {
	x, w, slope float64
	area, first float64
}

// plain reports whether the block is a rectangle.
func (k *block) plain() bool { return k.x == 0 && k.slope == 0 }

// blockAt is the strip in which a block of depth a ends.
func (z *sizing) blockAt(a float64) block {
	for i := range z.parts {
		x1, x2, w1, w2 := z.strip(i)
		if a <= x2 || i == len(z.parts)-1 {
			k := block{x: x1, w: w1, slope: (w2 - w1) / (x2 - x1)}
			k.area, k.first = z.concrete(x1)
			return k
		}
	}
	return block{}
}

// blockInputs gives what the block depends on; width is the symbol of the width
// of the strip in which it ends.
func (e *edition) blockInputs(w *working, k *block, width string) {
	if k.x == 0 {
		w.given(width, "width of the compression face", "", e.asLength(k.w))
	} else {
		w.given("x", "depth at which the part of the section begins in which the block ends", "", e.asLength(k.x))
		w.given("Af", "area of concrete above that depth", "", e.asArea(k.area))
		w.given("Sf", "first moment of that area about the compression face", "", e.asFirst(k.first))
		w.given(width, "width of the section from that depth on", "", e.asLength(k.w))
	}
	if k.slope != 0 {
		w.given("k", "widening of the section with depth", "", asPlain(k.slope))
	}
}

// blockSteps gives area and first moment of the block, whose depth a is known.
func (e *edition) blockSteps(w *working, k *block, width string, a float64) {
	area, first := upper(a-k.x, k.w, k.slope)
	w.find("Ac", "area of concrete under the block", "22.2.2.4.1", k.areaForm(width), e.asArea(k.area+area))
	w.find("Sc", "first moment of that area about the compression face", "", k.firstForm(width), e.asFirst(k.first+first+area*k.x))
}

func (k *block) areaForm(width string) string {
	above, from := "Af + ", "(a - x)"
	if k.x == 0 {
		above, from = "", "a"
	}
	form := above + width + " " + from
	if k.slope != 0 {
		form += " + k " + from + "^2 / 2"
	}
	return form
}

func (k *block) firstForm(width string) string {
	switch {
	case k.plain():
		return width + " a^2 / 2"
	case k.x == 0:
		return width + " a^2 / 2 + k a^3 / 3"
	}
	form := "Sf + " + width + " (a^2 - x^2) / 2"
	if k.slope != 0 {
		form += " + k (a - x)^2 (x / 2 + (a - x) / 3)"
	}
	return form
}

// allYieldInTension reports whether every layer pulls with its yield strength
// outside the stress block, so that the closed form of a singly reinforced
// section holds.
func allYieldInTension(section mechanics.Section, u *mechanics.Ultimate) bool {
	for i := range u.Layers {
		if stateOf(section, u, i) != pullsAtYield {
			return false
		}
	}
	return true
}

type layerState uint8

const (
	elastic layerState = iota
	pullsAtYield
	pressesAtYield
)

func stateOf(section mechanics.Section, u *mechanics.Ultimate, i int) layerState {
	switch fy := section.Layers[i].Steel.Yield; u.Layers[i].Stress {
	case fy.Neg():
		return pullsAtYield
	case fy:
		return pressesAtYield
	}
	return elastic
}

// yieldingSteps is the closed form: all steel in tension at its yield
// strength.
func (e *edition) yieldingSteps(w *working, section mechanics.Section, u *mechanics.Ultimate, f *flexure, k *block) {
	area, depth := e.asArea(e.areaIn(u.TensionArea)), e.asLength(e.lengthIn(u.EffectiveDepth))
	n := len(u.Layers)
	if n == 1 {
		w.given("As", "area of the bars in tension", "", area)
		w.given("d", "depth of the bars in tension from the compression face", "", depth)
		w.note("h less the height of their centres above the tension face, by coordinates")
	} else {
		e.layerInputs(w, section, u)
		w.find("As", "area of all bars in tension", "", sum(n, "As#"), area)
		w.find("d", "depth to the centroid of all bars in tension", "", "("+sum(n, "As# d#")+") / As", depth)
	}
	a := e.lengthIn(u.NeutralAxis) * f.blockFactor
	form := "As fy / (0.85 f'c b)"
	switch rest := "(As fy / (0.85 f'c) - Af)"; {
	case k.slope != 0 && k.x == 0:
		form = "2 (As fy / (0.85 f'c)) / (b + √(b^2 + 2 k (As fy / (0.85 f'c))))"
	case k.slope != 0:
		form = "x + 2 " + rest + " / (b + √(b^2 + 2 k " + rest + "))"
	case k.x != 0:
		form = "x + " + rest + " / b"
	}
	w.find("a", "depth of the stress block", "22.2.2.4.1", form, e.asLength(a))
	w.note("every bar yields: see the strains below")
	e.blockFactorStep(w, f.blockFactor)
	w.find("c", "depth of the neutral axis", "22.2.2.4.2", "a / β1", e.asLength(e.lengthIn(u.NeutralAxis)))
	if n > 1 {
		e.layerStrains(w, u)
	}
	e.extremeStep(w, e.lengthIn(u.ExtremeDepth), f)
	form = "As fy (d - a / 2)"
	if !k.plain() {
		e.blockSteps(w, k, "b", a)
		form = "As fy d - 0.85 f'c Sc"
	}
	w.find("Mn", "nominal strength", "22.3", form, e.asMoment(e.momentIn(u.Nominal)))
}

// layeredSteps is the general case. Knowing which layers yield and in which part
// of the section the block ends, the balance of forces is a quadratic in c where
// that part has upright sides:
//
//	0.85 f'c β1 b c² + P c - Q = 0
//
// where P collects what is constant and Q what the elastic layers owe to c.
// The block ends inside the section: beyond it no layer would pull.
func (e *edition) layeredSteps(w *working, section mechanics.Section, z *sizing, u *mechanics.Ultimate, f *flexure, strength units.Stress, k *block) {
	e.layerInputs(w, section, u)
	under, about := "", ""
	if !f.axial.IsZero() {
		gross, first := z.concrete(z.height)
		w.given("Pn", "axial force at nominal strength, compression positive", "22.4", e.asForce(e.forceIn(f.axial)))
		w.note("Pu / φ, with the φ found below")
		w.given("yc", "depth of the centroid of the concrete section", "", e.asLength(first/gross))
		under, about = " + Pn", " + Pn yc"
	}
	w.given("Es", "modulus of elasticity of the bars", "20.2.2.2", e.asStress(e.materials.steelModulus))
	e.blockFactorStep(w, f.blockFactor)
	if k.slope == 0 {
		e.axisSteps(w, section, u, strength, f, k)
	} else {
		w.given("c", "depth of the neutral axis", "22.2.2.4.2", e.asLength(e.lengthIn(u.NeutralAxis)))
		w.note("the sides slope, so that the balance of forces is a cubic: c is its root, and the forces below balance")
	}
	a := f.blockFactor * e.lengthIn(u.NeutralAxis)
	w.find("a", "depth of the stress block", "22.2.2.4.1", "β1 c", e.asLength(a))
	e.layerStrains(w, u)
	n := len(u.Layers)
	for i, l := range u.Layers {
		k := strconv.Itoa(i + 1)
		fy := yieldSymbol(section, i)
		w.find("fs"+k, "stress of layer "+k+", tension positive", "20.2.2.1", "min("+fy+", max(-"+fy+", Es εs"+k+"))", e.asStress(-e.stressIn(l.Stress)))
		form, note := "As"+k+" fs"+k, ""
		if inBlock(&l) {
			form, note = "As"+k+" (fs"+k+" + 0.85 f'c)", "inside the block: less the concrete displaced"
		}
		w.find("Fs"+k, "force of layer "+k+", tension positive", "22.2.1.1", form, e.asForce(-e.forceIn(l.Force)))
		w.note(note)
	}
	concrete := e.asForce(e.forceIn(u.Concrete))
	moment := " - Cc a / 2"
	if k.plain() {
		w.find("Cc", "compression in the concrete", "22.2.2.4.1", "0.85 f'c a b", concrete)
	} else {
		e.blockSteps(w, k, "b", a)
		w.find("Cc", "compression in the concrete", "22.2.2.4.1", "0.85 f'c Ac", concrete)
		moment = " - 0.85 f'c Sc"
	}
	if k.slope != 0 {
		w.find("T", "pull of the steel, with the axial force, which balances Cc", "22.2.1.1", sum(n, "Fs#")+under, concrete)
	}
	e.extremeStep(w, e.lengthIn(u.ExtremeDepth), f)
	w.find("Mn", "nominal strength, moments about the compression face", "22.3", sum(n, "Fs# d#")+moment+about, e.asMoment(e.momentIn(u.Nominal)))
	if u.Equilibria > 1 {
		w.note("more than one depth of the neutral axis balances the section; the least was taken")
	}
}

// yieldSymbol is the symbol of the yield strength of a layer.
func yieldSymbol(section mechanics.Section, i int) string {
	if oneYield(section) {
		return "fy"
	}
	return "fy" + strconv.Itoa(i+1)
}

// axisSteps solves the quadratic for c.
func (e *edition) axisSteps(w *working, section mechanics.Section, u *mechanics.Ultimate, strength units.Stress, f *flexure, k *block) {
	var constant, owed []string
	var p, q float64
	fc, es := e.stressIn(strength), e.materials.steelModulus
	for i := range u.Layers {
		k, sy := strconv.Itoa(i+1), yieldSymbol(section, i)
		area, fy := e.areaIn(section.Layers[i].Area), e.stressIn(section.Layers[i].Steel.Yield)
		displaced, less := 0.0, ""
		if inBlock(&u.Layers[i]) {
			displaced, less = blockIntensity*fc, " - 0.85 f'c"
		}
		switch stateOf(section, u, i) {
		case pullsAtYield:
			constant = append(constant, "- As"+k+" "+sy)
			p -= area * fy
		case pressesAtYield:
			constant = append(constant, "+ As"+k+" ("+sy+less+")")
			p += area * (fy - displaced)
		default:
			constant = append(constant, "+ As"+k+" (0.003 Es"+less+")")
			p += area * (crushing*es - displaced)
			owed = append(owed, "As"+k+" 0.003 Es d"+k)
			q += area * crushing * es * e.lengthIn(u.Layers[i].Depth)
		}
	}
	meaning := "steel forces that do not change with c"
	if k.x != 0 {
		constant = append(constant, "+ 0.85 f'c (Af - b x)")
		p += blockIntensity * fc * (k.area - k.w*k.x)
		meaning = "forces that do not change with c"
	}
	if !f.axial.IsZero() {
		constant = append(constant, "- Pn")
		p -= e.forceIn(f.axial)
		meaning = "forces that do not change with c"
	}
	w.find("P", meaning, "22.2.1.1", strings.TrimPrefix(strings.Join(constant, " "), "+ "), e.asForce(p))
	c := e.asLength(e.lengthIn(u.NeutralAxis))
	if len(owed) == 0 {
		w.find("c", "depth of the neutral axis", "22.2.2.4.2", "-P / (0.85 f'c β1 b)", c)
		return
	}
	w.find("Q", "what the layers below yield owe to c", "22.2.1.1", strings.Join(owed, " + "), e.asMoment(q))
	// Of the two forms of the root, the one that adds like signs.
	form := "(√(P^2 + 4 (0.85 f'c β1 b) Q) - P) / (2 (0.85 f'c β1 b))"
	if p > 0 {
		form = "2 Q / (P + √(P^2 + 4 (0.85 f'c β1 b) Q))"
	}
	w.find("c", "depth of the neutral axis", "22.2.2.4.2", form, c)
	w.note("forces balance: 0.85 f'c β1 b c^2 + P c - Q = 0")
}

func inBlock(l *mechanics.LayerState) bool { return !l.Displaced.IsZero() }

// layerInputs gives area and depth of each layer.
func (e *edition) layerInputs(w *working, section mechanics.Section, u *mechanics.Ultimate) {
	for i, l := range u.Layers {
		k := strconv.Itoa(i + 1)
		w.given("As"+k, "area of layer "+k, "", e.asArea(e.areaIn(section.Layers[i].Area)))
		w.given("d"+k, "depth of layer "+k+" from the compression face", "", e.asLength(e.lengthIn(l.Depth)))
		if fy := yieldSymbol(section, i); fy != "fy" {
			w.given(fy, "yield strength of layer "+k, "20.2.2.4", e.asStress(e.stressIn(section.Layers[i].Steel.Yield)))
		}
	}
}

func (e *edition) layerStrains(w *working, u *mechanics.Ultimate) {
	for i, l := range u.Layers {
		k := strconv.Itoa(i + 1)
		w.find("εs"+k, "strain of layer "+k+", tension positive", "22.2.1.2", "0.003 (d"+k+" - c) / c", asPlain(-l.Strain))
	}
}

// extremeStep gives εt, the strain of the layer farthest from the compression
// face.
func (e *edition) extremeStep(w *working, depth float64, f *flexure) {
	w.given("dt", "depth of the extreme layer in tension", "", e.asLength(depth))
	w.find("εt", "net tensile strain of the extreme layer", "22.2.1.2", "0.003 (dt - c) / c", asPlain(f.strain))
}

// blockFactorStep gives β1 by the branch that f'c is on.
func (e *edition) blockFactorStep(w *working, beta1 float64) {
	m := &e.materials
	const clause = "Table 22.2.2.4.3"
	switch beta1 {
	case blockMost:
		w.find("β1", "depth of the block over that of the neutral axis", clause, number(blockMost), asPlain(beta1))
		w.note("f'c is at most " + e.stress.Format(e.stressOf(m.blockFull)))
	case blockLeast:
		w.find("β1", "depth of the block over that of the neutral axis", clause, number(blockLeast), asPlain(beta1))
		w.note("f'c is at least " + e.stress.Format(e.stressOf(m.blockLeast)))
	default:
		w.find("β1", "depth of the block over that of the neutral axis", clause,
			"0.85 - 0.05 (f'c - "+number(m.blockFull)+") / "+number(m.blockStep), asPlain(beta1))
	}
}

// yieldStrainStep gives εty; fy is given before.
func (e *edition) yieldStrainStep(w *working, f *flexure, rounded bool) {
	if rounded && e.isGrade60(f.yield) {
		w.find("εty", "yield strain by which the section is classed", "21.2.2.1", number(roundedYield), asPlain(f.yieldStrain))
		w.note("permitted rounding for Grade 60")
		return
	}
	if !w.has("Es") {
		w.given("Es", "modulus of elasticity of the bars", "20.2.2.2", e.asStress(e.materials.steelModulus))
	}
	w.find("εty", "yield strain by which the section is classed", "21.2.2.1", "fy / Es", asPlain(f.yieldStrain))
}

// phiSteps gives φ by the class of the section.
func (e *edition) phiSteps(w *working, f *flexure, rounded bool) {
	r := &e.reduction
	e.yieldStrainStep(w, f, rounded)
	form := number(r.tension)
	switch f.class {
	case compressionControlled:
		form = number(r.compression)
	case transition:
		span := number(r.margin)
		if r.fixedTension > 0 {
			span = "(" + number(r.fixedTension) + " - εty)"
		}
		form = number(r.compression) + " + 0.25 (εt - εty) / " + span
	}
	w.find("φ", "strength reduction factor", "Table 21.2.2", form, asPlain(f.phi))
	w.note(f.class)
}

const noteAllPull = "the bars beyond the spread of 24.3.4 pulling too, which lowers the strain"

// strainSteps is the working of the strain limit.
func (e *edition) strainSteps(t *beam.Trial, s beam.Sense, f *flexure) *working {
	w := new(working)
	b := &t.Brief
	w.given("c", "depth of the neutral axis", "22.2.2.4.2", e.asLength(e.lengthIn(f.axis)))
	switch {
	case f.all && !f.axial.IsZero():
		w.note("with the axial force acting, and " + noteAllPull)
	case f.all:
		w.note("with " + noteAllPull)
	case !f.axial.IsZero():
		w.note("with the axial force acting")
	}
	e.extremeStep(w, e.lengthIn(f.extreme), f)
	if e.reduction.fixedLeast > 0 {
		w.find("εt,min", "least net tensile strain of a beam", "9.3.3.1", number(e.reduction.fixedLeast), asPlain(f.leastStrain))
		return w
	}
	w.given("fy", "yield strength of the bars", "20.2.2.4", e.asStress(e.stressIn(f.yield)))
	if !oneYield(e.trialSection(t, s)) {
		w.note("the greatest of the steel in tension")
	}
	e.yieldStrainStep(w, f, b.Readings.RoundedYield)
	w.find("εt,min", "least net tensile strain of a beam", "9.3.3.1", "εty + "+number(e.reduction.margin), asPlain(f.leastStrain))
	return w
}

// minimumSteps is the working of least steel; req is the steel required by
// analysis where 9.6.1.3 was looked at.
func (e *edition) minimumSteps(t *beam.Trial, s beam.Sense, m *minimumSteel, req *requiredTension, moment units.Moment) *working {
	w := new(working)
	b := &t.Brief
	w.given("f'c", "specified concrete strength", "19.2.1", e.asStress(e.stressIn(b.Concrete.Strength)))
	w.given("fy", "yield strength of the bars", "20.2.2.4", e.asStress(e.stressIn(faceYield(t, s))))
	if len(t.Steel(s.TensionFace()).Rows) > 0 && !e.oneFaceYield(t, s) {
		w.note("the least of those at the tension face")
	}
	m.minimumWidth.steps(e, w)
	w.given("d", "depth to the centroid of the tension steel", "", e.asLength(m.depth))
	m.steelSteps(e, w)
	if req.ok && req.phi == e.reduction.tension {
		w.given("Mu", "factored moment", momentClause(t), e.asMoment(e.momentIn(moment)))
		w.find("φ", "strength reduction factor", "Table 21.2.2", number(req.phi), asPlain(req.phi))
		w.note("with so little steel the section is tension-controlled")
		e.requiredSteps(t, s, w, m.width, req)
		w.find("As,4/3", "steel that waives 9.6.1.2", "9.6.1.3", "(4 / 3) As,req", e.asArea(e.minimum.waiver*req.area))
	}
	w.given("As", "steel provided at the tension face", "", e.asArea(e.areaIn(tensionArea(t, s))))
	return w
}

func (e *edition) oneFaceYield(t *beam.Trial, s beam.Sense) bool {
	rows := t.Steel(s.TensionFace()).Rows
	for i := range rows {
		if rows[i].Yield != rows[0].Yield {
			return false
		}
	}
	return true
}

// requiredSteps is the way to the steel required by analysis; b is the width of
// least steel.
func (e *edition) requiredSteps(t *beam.Trial, s beam.Sense, w *working, b float64, req *requiredTension) {
	z := e.trialSizing(t, s)
	k := z.blockAt(req.block)
	const clause = "22.3"
	if k.plain() {
		width := "b"
		if k.w != b {
			width = "bc"
			e.blockInputs(w, &k, width)
		}
		w.find("a", "depth of the block that the moment needs", clause, "d - √(d^2 - 2 Mu / (φ 0.85 f'c "+width+"))", e.asLength(req.block))
		w.find("As,req", "steel required by analysis", clause, "0.85 f'c "+width+" a / fy", e.asArea(req.area))
		return
	}
	e.blockInputs(w, &k, "bc")
	if k.slope == 0 {
		w.find("a", "depth of the block that the moment needs", clause, "d - √((d - x)^2 - 2 (Mu / (φ 0.85 f'c) - (Af d - Sf)) / bc)", e.asLength(req.block))
	} else {
		w.given("a", "depth of the block that the moment needs", clause, e.asLength(req.block))
		w.note("the sides slope, so that it is the root of a cubic: φ 0.85 f'c (Ac d - Sc) is Mu")
		e.blockSteps(w, &k, "bc", req.block)
		w.find("As,req", "steel required by analysis", clause, "0.85 f'c Ac / fy", e.asArea(req.area))
		return
	}
	w.find("As,req", "steel required by analysis", clause, "0.85 f'c (Af + bc (a - x)) / fy", e.asArea(req.area))
}

// sum writes n terms of a form in which # stands for the number of the term.
func sum(n int, form string) string {
	terms := make([]string, n)
	for i := range terms {
		terms[i] = strings.ReplaceAll(form, "#", strconv.Itoa(i+1))
	}
	return strings.Join(terms, " + ")
}
