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
	w.given("Mu", "factored moment", momentClause(t), e.asMoment(e.momentIn(moment)))
	e.strengthSteps(w, e.trialSection(t, s), &t.Ultimate, b.Concrete.Strength, f)
	e.phiSteps(w, f, b.Reinforcement.Yield, b.Readings.RoundedYield)
	w.find("φMn", "design strength", "9.5.1.1", "φ Mn", e.asMoment(e.momentIn(f.design)))
	return w
}

// strengthSteps writes the way to Mn. All bars have one yield strength.
func (e *edition) strengthSteps(w *working, section mechanics.Section, u *mechanics.Ultimate, strength units.Stress, f *flexure) {
	w.given("f'c", "specified concrete strength", "19.2.1", e.asStress(e.stressIn(strength)))
	w.given("fy", "yield strength of the bars", "20.2.2.4", e.asStress(e.stressIn(section.Layers[0].Steel.Yield)))
	w.given("b", "width of the compression face", "", e.asLength(e.lengthIn(section.Parts[0].Width)))
	if allYieldInTension(section, u) {
		e.yieldingSteps(w, section, u, f)
	} else {
		e.layeredSteps(w, section, u, f, strength)
	}
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
func (e *edition) yieldingSteps(w *working, section mechanics.Section, u *mechanics.Ultimate, f *flexure) {
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
	w.find("a", "depth of the stress block", "22.2.2.4.1", "As fy / (0.85 f'c b)", e.asLength(a))
	w.note("every bar yields: see the strains below")
	e.blockFactorStep(w, f.blockFactor)
	w.find("c", "depth of the neutral axis", "22.2.2.4.2", "a / β1", e.asLength(e.lengthIn(u.NeutralAxis)))
	if n > 1 {
		e.layerStrains(w, u)
	}
	e.extremeStep(w, u, f)
	w.find("Mn", "nominal strength", "22.3", "As fy (d - a / 2)", e.asMoment(e.momentIn(u.Nominal)))
}

// layeredSteps is the general case. Knowing which layers yield, the balance of
// forces is a quadratic in c:
//
//	0.85 f'c β1 b c² + P c - Q = 0
//
// where P collects what is constant and Q what the elastic layers owe to c.
// The block ends inside the section: beyond it no layer would pull.
func (e *edition) layeredSteps(w *working, section mechanics.Section, u *mechanics.Ultimate, f *flexure, strength units.Stress) {
	e.layerInputs(w, section, u)
	w.given("Es", "modulus of elasticity of the bars", "20.2.2.2", e.asStress(e.materials.steelModulus))
	e.blockFactorStep(w, f.blockFactor)
	e.axisSteps(w, section, u, strength)
	w.find("a", "depth of the stress block", "22.2.2.4.1", "β1 c", e.asLength(f.blockFactor*e.lengthIn(u.NeutralAxis)))
	e.layerStrains(w, u)
	n := len(u.Layers)
	for i, l := range u.Layers {
		k := strconv.Itoa(i + 1)
		w.find("fs"+k, "stress of layer "+k+", tension positive", "20.2.2.1", "min(fy, max(-fy, Es εs"+k+"))", e.asStress(-e.stressIn(l.Stress)))
		form, note := "As"+k+" fs"+k, ""
		if inBlock(&l) {
			form, note = "As"+k+" (fs"+k+" + 0.85 f'c)", "inside the block: less the concrete displaced"
		}
		w.find("Fs"+k, "force of layer "+k+", tension positive", "22.2.1.1", form, e.asForce(-e.forceIn(l.Force)))
		w.note(note)
	}
	w.find("Cc", "compression in the concrete", "22.2.2.4.1", "0.85 f'c a b", e.asForce(e.forceIn(u.Concrete)))
	e.extremeStep(w, u, f)
	w.find("Mn", "nominal strength, moments about the compression face", "22.3", sum(n, "Fs# d#")+" - Cc a / 2", e.asMoment(e.momentIn(u.Nominal)))
	if u.Equilibria > 1 {
		w.note("more than one depth of the neutral axis balances the section; the least was taken")
	}
}

// axisSteps solves the quadratic for c.
func (e *edition) axisSteps(w *working, section mechanics.Section, u *mechanics.Ultimate, strength units.Stress) {
	var constant, owed []string
	var p, q float64
	fc, es := e.stressIn(strength), e.materials.steelModulus
	for i := range u.Layers {
		k := strconv.Itoa(i + 1)
		area, fy := e.areaIn(section.Layers[i].Area), e.stressIn(section.Layers[i].Steel.Yield)
		displaced, less := 0.0, ""
		if inBlock(&u.Layers[i]) {
			displaced, less = blockIntensity*fc, " - 0.85 f'c"
		}
		switch stateOf(section, u, i) {
		case pullsAtYield:
			constant = append(constant, "- As"+k+" fy")
			p -= area * fy
		case pressesAtYield:
			constant = append(constant, "+ As"+k+" (fy"+less+")")
			p += area * (fy - displaced)
		default:
			constant = append(constant, "+ As"+k+" (0.003 Es"+less+")")
			p += area * (crushing*es - displaced)
			owed = append(owed, "As"+k+" 0.003 Es d"+k)
			q += area * crushing * es * e.lengthIn(u.Layers[i].Depth)
		}
	}
	w.find("P", "steel forces that do not change with c", "22.2.1.1", strings.TrimPrefix(strings.Join(constant, " "), "+ "), e.asForce(p))
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
func (e *edition) extremeStep(w *working, u *mechanics.Ultimate, f *flexure) {
	w.given("dt", "depth of the extreme layer in tension", "", e.asLength(e.lengthIn(u.ExtremeDepth)))
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
func (e *edition) yieldStrainStep(w *working, f *flexure, rounded bool, yield units.Stress) {
	if rounded && e.isGrade60(yield) {
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
func (e *edition) phiSteps(w *working, f *flexure, yield units.Stress, rounded bool) {
	r := &e.reduction
	e.yieldStrainStep(w, f, rounded, yield)
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

// strainSteps is the working of the strain limit.
func (e *edition) strainSteps(t *beam.Trial, f *flexure) *working {
	w := new(working)
	u, b := &t.Ultimate, &t.Brief
	w.given("c", "depth of the neutral axis", "22.2.2.4.2", e.asLength(e.lengthIn(u.NeutralAxis)))
	e.extremeStep(w, u, f)
	if e.reduction.fixedLeast > 0 {
		w.find("εt,min", "least net tensile strain of a beam", "9.3.3.1", number(e.reduction.fixedLeast), asPlain(f.leastStrain))
		return w
	}
	w.given("fy", "yield strength of the bars", "20.2.2.4", e.asStress(e.stressIn(b.Reinforcement.Yield)))
	e.yieldStrainStep(w, f, b.Readings.RoundedYield, b.Reinforcement.Yield)
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
	m.minimumWidth.steps(e, w)
	w.given("d", "depth to the centroid of the tension steel", "", e.asLength(m.depth))
	m.steelSteps(e, w)
	if req.ok && req.phi == e.reduction.tension {
		w.given("Mu", "factored moment", momentClause(t), e.asMoment(e.momentIn(moment)))
		w.find("φ", "strength reduction factor", "Table 21.2.2", number(req.phi), asPlain(req.phi))
		w.note("with so little steel the section is tension-controlled")
		w.find("a", "depth of the block that the moment needs", "22.3", "d - √(d^2 - 2 Mu / (φ 0.85 f'c b))", e.asLength(req.block))
		w.find("As,req", "steel required by analysis", "22.3", "0.85 f'c b a / fy", e.asArea(req.area))
		w.find("As,4/3", "steel that waives 9.6.1.2", "9.6.1.3", "(4 / 3) As,req", e.asArea(e.minimum.waiver*req.area))
	}
	w.given("As", "steel provided at the tension face", "", e.asArea(e.areaIn(t.Steel(s.TensionFace()).Area)))
	return w
}

// sum writes n terms of a form in which # stands for the number of the term.
func sum(n int, form string) string {
	terms := make([]string, n)
	for i := range terms {
		terms[i] = strings.ReplaceAll(form, "#", strconv.Itoa(i+1))
	}
	return strings.Join(terms, " + ")
}
