package aci318

import "soffit.example/beam"

// outlineSteps gives Acp and pcp.
func (t *torsionStrength) outlineSteps(e *edition, out *working) {
	const area, perimeter = "area enclosed by the outside perimeter", "outside perimeter"
	if t.outline && t.counted {
		out.given("Acp", area, "22.7.4.1", e.asArea(t.enclosed))
		if t.cut {
			out.note("overhangs thinner than half the depth count as far as the web projects beyond them, and no more than four times their thickness (9.2.4.4)")
		}
		out.given("pcp", perimeter, "22.7.4.1", e.asLength(t.perimeter))
		return
	}
	out.given("b", "width", "", e.asLength(t.width))
	out.given("h", "overall depth", "", e.asLength(t.depth))
	if t.counted {
		out.given("hf", "flange thickness", "", e.asLength(t.flange))
		out.given("o", "overhangs of the flange as far as they count", "9.2.4.4", e.asLength(t.left+t.right))
		out.find("Acp", area, "22.7.4.1", "b h + o hf", e.asArea(t.enclosed))
		out.find("pcp", perimeter, "22.7.4.1", "2 (b + h + o)", e.asLength(t.perimeter))
		return
	}
	out.find("Acp", area, "22.7.4.1", "b h", e.asArea(t.enclosed))
	if t.left+t.right > 0 || t.outline {
		out.note("flanges are left out, as Acp²/pcp would be less with them (9.2.4.4)")
	}
	out.find("pcp", perimeter, "22.7.4.1", "2 (b + h)", e.asLength(t.perimeter))
}

// thresholdSteps is the working of φTth.
func (t *torsionStrength) thresholdSteps(e *edition) []beam.Step {
	r := &e.torsion
	var out working
	out.given("λ", "factor for lightweight concrete", t.light.clause, asPlain(t.light.factor))
	out.note(t.light.route)
	out.given("r", "root of the concrete strength", "22.7.2.1", e.asStress(t.root))
	if t.rootCapped {
		out.note("capped")
	}
	t.outlineSteps(e, &out)
	basis := "Acp"
	if t.hollow {
		if basis = "Ag"; t.axial != 0 { // whose Ag is of the whole section
			basis = "Ag,cp"
		}
		out.given(basis, "what of Acp is concrete", "22.7.4.1", e.asArea(t.gross))
		out.note("a hollow section: this in place of Acp")
	}
	expression := number(r.threshold) + " λ r " + basis + "^2 / pcp"
	if t.axial != 0 {
		out.given("Nu", "factored axial force, compression positive", "", e.asForce(t.axial))
		out.given("Ag", "area of the concrete of the whole section", "22.7.4.1", e.asArea(t.area))
		out.find("k", "factor for the axial force", "22.7.4.1",
			"√(max(0, 1 + Nu / ("+number(r.axial)+" Ag λ r)))", asPlain(t.axialFactor))
		expression += " k"
	}
	out.find("Tth", "threshold torsion", "22.7.4.1", expression, e.asMoment(t.threshold))
	out.given("φ", "strength reduction factor for torsion", "Table 21.2.1", asPlain(t.phi))
	out.find("φTth", "torque below which torsion may be neglected", "9.5.4.1", "φ Tth", e.asMoment(t.phi*t.threshold))
	return out.steps
}

// torqueSteps gives Tu.
func (t *torsionStrength) torqueSteps(e *edition, out *working, q *sectionTorque) {
	if q.used == q.acting {
		out.given("Tu", "factored torque", "", e.asMoment(q.used))
		return
	}
	out.given("T", "torque as analysed", "", e.asMoment(q.acting))
	out.given("T,E", "the part that equilibrium needs", "22.7.3.1", e.asMoment(q.equilibrium))
	out.given("φTcr", "cracking torsion, reduced", "22.7.5.1", e.asMoment(t.phi*t.cracking))
	out.find("Tu", "torque designed for", "22.7.3.2", "max(T,E, min(T, φTcr))", e.asMoment(q.used))
	if q.shed > 0 {
		out.note("the neighbours must take the rest")
	}
}

// steps gives Aoh and ph.
func (c *torsionCage) steps(e *edition, out *working) {
	if !out.has("b") {
		out.given("b", "width of the strip that the stirrups stand in", "", e.asLength(c.width))
	}
	if !out.has("h") {
		out.given("h", "overall depth", "", e.asLength(c.depth))
	}
	out.given("c", "clear cover to the stirrup", "", e.asLength(c.cover))
	out.given("dst", "stirrup diameter", "", e.asLength(c.tie))
	out.find("x1", "width between the centrelines of the stirrup", "22.7.6.1.1", "b - 2 c - dst", e.asLength(c.x1))
	out.find("y1", "height between them", "22.7.6.1.1", "h - 2 c - dst", e.asLength(c.y1))
	out.find("ph", "perimeter of the centreline", "22.7.6.1", "2 (x1 + y1)", e.asLength(c.perimeter))
}

// flowSteps gives what At/s for a torque follows from.
func (c *torsionCage) flowSteps(e *edition, out *working) {
	out.find("Aoh", "area enclosed by the centreline", "22.7.6.1.1", "x1 y1", e.asArea(c.area))
	out.find("Ao", "area enclosed by the shear flow", "22.7.6.1.1", number(flowShare)+" Aoh", e.asArea(c.flow))
	if !out.has("fyt") {
		out.given("fyt", "stirrup yield strength as it may be used in torsion", e.materials.yieldClause, e.asStress(c.fyt))
		if c.fytCapped {
			out.note("capped")
		}
	}
	out.given("cotθ", "cotangent of the angle of the compression diagonals", "22.7.6.1.2", asPlain(c.cot))
	out.note("θ = " + number(c.angle) + " degrees")
	if !out.has("φ") {
		out.given("φ", "strength reduction factor for torsion", "Table 21.2.1", asPlain(c.phi))
	}
}

// adequacySteps is the working of 22.7.7.1.
func (z *webZone) adequacySteps(w *worstTorsion) []beam.Step {
	e, c, v := z.e, &z.torsion.cage, &w.values
	web := z.webFor(w.sense, w.action.Shear)
	strength := z.torsion.strength
	strength.load(e, w.action.Axial)
	var out working
	web.concreteSteps(e, &out, &w.shear)
	strength.torqueSteps(e, &out, &v.sectionTorque)
	c.steps(e, &out)
	out.find("Aoh", "area enclosed by the centreline", "22.7.6.1.1", "x1 y1", e.asArea(c.area))
	out.find("v,V", "stress of the shear", "22.7.7.1", "Vu / (bw d)", e.asStress(v.shearStress))
	if !c.walls {
		out.find("v,T", "stress of the torque", "22.7.7.1", "Tu ph / ("+number(sectionShare)+" Aoh^2)", e.asStress(v.beside))
		out.find("v", "both together", "22.7.7.1(a)", "√(v,V^2 + v,T^2)", e.asStress(v.stress))
	} else {
		c.wallStressSteps(e, &out, "v,T", "t", "beside the hollow", c.beside, v.beside)
		expression := "v,V + v,T"
		if v.flatGoverns {
			c.wallStressSteps(e, &out, "v,F", "t,F", "above or below the hollow", c.flat, v.flat)
			expression = "max(v,V + v,T, v,F)"
		}
		out.find("v", "stress where it is greatest", "22.7.7.1(b)", expression, e.asStress(v.stress))
		if v.flatGoverns {
			out.note("in the wall above or below the hollow, which has no part in the shear")
		}
	}
	out.find("v,max", "greatest stress for the section", "22.7.7.1",
		"φ (Vc / (bw d) + "+number(e.shear.section)+" √f'c)", e.asStress(v.limit))
	return out.steps
}

// wallStressSteps gives the stress of the torque in a wall.
func (c *torsionCage) wallStressSteps(e *edition, out *working, symbol, wall, where string, thickness, stress float64) {
	meaning := "stress of the torque in the walls " + where
	if !c.thin(thickness) {
		out.find(symbol, meaning, "22.7.7.1", "Tu ph / ("+number(sectionShare)+" Aoh^2)", e.asStress(stress))
		return
	}
	out.given(wall, "thickness of the thinnest wall "+where, "", e.asLength(thickness))
	out.find(symbol, meaning, "22.7.7.1.2", "Tu / ("+number(sectionShare)+" Aoh "+wall+")", e.asStress(stress))
	out.note("the wall is thinner than Aoh/ph")
}

// transverseSteps is the working of what an outer leg carries.
func (z *webZone) transverseSteps(w *worstTorsion) []beam.Step {
	e, q, v := z.e, &z.torsion, &w.values
	web := z.webFor(w.sense, w.action.Shear)
	strength := q.strength
	strength.load(e, w.action.Axial)
	var out working
	web.concreteSteps(e, &out, &w.shear)
	strength.torqueSteps(e, &out, &v.sectionTorque)
	if v.distant {
		out.note("of a section within bt + d = " + e.length.Format(q.reach))
	}
	q.cage.steps(e, &out)
	q.cage.flowSteps(e, &out)
	out.find("at", "area per length that the torque needs of one leg", "22.7.6.1(a)",
		"Tu / (2 φ Ao fyt cotθ)", e.asSteel(v.leg))
	out.find("Vs,req", "shear that stirrups must carry", e.stirrups.requiredClause, "max(Vu / φ - Vc, 0)", e.asForce(w.shear.needed))
	if w.shear.bent > 0 {
		out.note("bent bars are not counted beside a torque")
	}
	out.find("av", "area per length that the shear needs of all legs", e.stirrups.strengthClause, "Vs,req / (fyt d)", e.asSteel(v.shear))
	lift := ""
	if v.lift > 0 {
		out.given("al", "area per length of all legs that lifts what hangs here", "R9.4.3.2", e.asSteel(v.lift))
		lift = " + al"
	}
	out.given("nl", "legs", "", asPlain(q.legs))
	out.find("ao,req", "area per length of an outer leg", "9.5.4.3", "(av"+lift+") / nl + at", e.asSteel(v.outer))
	out.note("the outer legs alone resist torsion; shear is shared by all")
	if q.leg > 0 {
		out.given("s", "spacing along the beam", "", e.asLength(web.s))
		out.given("Ab", "area of a leg", "", e.asArea(q.leg*web.s))
		out.find("ao", "area per length of an outer leg provided", "", "Ab / s", e.asSteel(q.leg))
	}
	return out.steps
}

// leastTorsionSteps is the working of 9.6.4.2.
func (z *webZone) leastTorsionSteps() []beam.Step {
	e, w := z.e, &z.web[0]
	r := &e.stirrups
	var out working
	out.given("f'c", "specified concrete strength", "", e.asStress(w.bare.fc))
	out.given("bw", "web width", "", e.asLength(w.bare.bw))
	w.stirrupSteps(e, &out)
	out.find("a,1", "least area per length by concrete strength", "9.6.4.2(a)", number(r.root)+" √f'c bw / fyt", e.asSteel(w.byRoot))
	out.find("a,2", "least area per length", "9.6.4.2(b)", number(r.floor)+" bw / fyt", e.asSteel(w.byFloor))
	out.find("a,min", "least (Av + 2At)/s", "9.6.4.2", "max(a,1, a,2)", e.asSteel(w.least))
	out.find("a", "area per length provided, all legs", "", "Av / s", e.asSteel(w.provided))
	return out.steps
}

// spacingSteps is the working of 9.7.6.3.3.
func (c *torsionCage) spacingSteps(e *edition, spacing float64) []beam.Step {
	var out working
	c.steps(e, &out)
	out.find("s,max", "greatest spacing along the beam", "9.7.6.3.3",
		"min(ph / "+number(perimeters)+", "+number(e.torsion.along)+")", e.asLength(c.along))
	out.given("s", "spacing along the beam", "", e.asLength(spacing))
	return out.steps
}

// barDiameterSteps is the working of 9.7.5.2.
func (e *edition) barDiameterSteps(spacing, smallest float64) []beam.Step {
	var out working
	out.given("s", "spacing of the stirrups", "", e.asLength(spacing))
	out.find("db,min", "least diameter of longitudinal bars", "9.7.5.2",
		"max("+number(barShare)+" s, "+number(e.torsion.bar)+")", e.asLength(max(barShare*spacing, e.torsion.bar)))
	out.given("db", "diameter of the smallest bar", "", e.asLength(smallest))
	return out.steps
}

// wallSteps is the working of 9.7.6.3.4.
func (c *torsionCage) wallSteps(e *edition) []beam.Step {
	var out working
	c.steps(e, &out)
	out.find("Aoh", "area enclosed by the centreline", "22.7.6.1.1", "x1 y1", e.asArea(c.area))
	out.find("e,min", "least distance from the centreline to a hollow", "9.7.6.3.4",
		number(wallShare)+" Aoh / ph", e.asLength(c.wallNeeded))
	out.given("t", "thickness of the thinnest wall", "", e.asLength(min(c.beside, c.flat)))
	out.find("e", "distance from the centreline to the hollow", "", "t - c - dst / 2", e.asLength(c.wall))
	return out.steps
}

// pullSteps gives the longitudinal steel of torsion, all round.
func (c *torsionCage) pullSteps(e *edition, out *working, n *faceNeed, fy float64) {
	out.given("Tu", "factored torque designed for", "22.7.3", e.asMoment(n.most))
	c.steps(e, out)
	c.flowSteps(e, out)
	out.find("at", "area per length that the torque needs of one leg", "22.7.6.1(a)", "Tu / (2 φ Ao fyt cotθ)", e.asSteel(n.leg))
	out.find("F", "pull along the beam", "22.7.6.1(b)", "at ph fyt cotθ^2", e.asForce(n.strength))
	out.given("f'c", "specified concrete strength", "", e.asStress(c.fc))
	out.given("Acp", "area enclosed by the outside perimeter", "", e.asArea(c.enclosed))
	out.given("bw", "web width", "", e.asLength(c.web))
	low := "at"
	if n.low != n.most {
		out.given("Tu,low", "the least torque of the part of the beam that is not neglected", "", e.asMoment(n.low))
		out.find("at,low", "At/s for it", "22.7.6.1(a)", "Tu,low / (2 φ Ao fyt cotθ)", e.asSteel(c.legFor(n.low)))
		low = "at,low"
	}
	out.find("at,min", "At/s as 9.6.4.3 takes it", "9.6.4.3", "max("+low+", "+number(e.torsion.floor)+" bw / fyt)", e.asSteel(max(c.legFor(n.low), c.least)))
	out.find("F,min", "least pull, the lesser of both expressions", "9.6.4.3",
		"max("+number(e.torsion.longitudinal)+" √f'c Acp - at,min ph fyt, 0)", e.asForce(n.least))
	out.given("fy", "yield strength of the bars as it may be used in torsion", e.materials.yieldClause, e.asStress(fy))
	out.find("Al", "longitudinal steel all round", "9.5.4.3", "max(F, F,min) / fy", e.asArea(max(n.strength, n.least)/fy))
}

// partSteps gives the parts of a side.
func (c *torsionCage) partSteps(e *edition, out *working) {
	out.given("m", "parts into which bars just close enough divide a side", "9.7.5.1", asPlain(c.sideParts(e)))
	out.note("no further apart than " + e.length.Format(e.lengthOf(e.torsion.around)))
}

// faceSteps is the working of the bars of a face.
func (f *torsionFaces) faceSteps(face *torsionFace, inside bool) []beam.Step {
	e, c, n := f.e, &f.cage, &face.worst
	var out working
	c.pullSteps(e, &out, n, face.fy)
	c.partSteps(e, &out)
	const share = "(x1 + y1 / m) / ph"
	out.find("A,t", "what of it lies at this face", "9.7.5.1", "Al "+share, e.asArea(n.share))
	out.note("steel is spread evenly over the perimeter of the stirrup; the bars in the corners take half a part of each side")
	switch {
	case n.moment <= 0:
		out.given("Mu", "factored moment that presses on this face", "", e.asMoment(-n.moment))
		out.given("d", "depth to the bars at the opposite face", "", e.asLength(face.lever))
		out.find("A,c", "what the compression takes over", "9.5.4.5", "Mu / ("+number(creditShare)+" d fy)", e.asArea(n.relief))
		out.find("A,min", "the least that it must leave", "9.5.4.5", "F,min / fy "+share, e.asArea(n.floor))
		out.given("A,N", "steel for axial tension", "22.2", e.asArea(n.pulled))
		if inside {
			out.find("A,req", "steel required inside the stirrups", "9.5.4.3", "max(A,t - A,c, A,min)", e.asArea(n.inside))
		} else {
			out.find("A,req", "steel required at this face", "9.5.4.3", "max(A,t + A,N - A,c, A,min)", e.asArea(n.need))
		}
	case inside:
		out.find("A,req", "steel required inside the stirrups", "9.7.5.1", "A,t", e.asArea(n.inside))
	default:
		out.given("Mu", "factored moment that pulls at this face", "", e.asMoment(n.moment))
		out.given("As,req", "steel that it needs", "22.2", e.asArea(n.bending))
		out.find("A,req", "steel required at this face", "9.5.4.3", "As,req + A,t", e.asArea(n.need))
	}
	out.given("A", "steel provided", "", e.asArea(face.area))
	if inside {
		out.steps[len(out.steps)-1].Value = e.asArea(face.web).amount
	}
	return out.steps
}

// sideSteps is the working of the bars along a side.
func (f *torsionFaces) sideSteps(fy, provided float64) []beam.Step {
	e, n := f.e, &f.side.need
	var out working
	f.cage.pullSteps(e, &out, n, fy)
	f.cage.partSteps(e, &out)
	out.find("A,req", "what of it lies along each side", "9.7.5.1", "Al y1 (1 - 1 / m) / ph", e.asArea(f.cage.sideShare(e)*max(n.strength, n.least)/fy))
	out.note("steel is spread evenly over the perimeter of the stirrup; the bars in the corners take half a part of each side")
	out.given("A", "steel provided along each side", "", e.asArea(provided))
	return out.steps
}
