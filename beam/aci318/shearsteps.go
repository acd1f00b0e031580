package aci318

import (
	"strconv"

	"soffit.example/beam"
	"soffit.example/units"
)

// number writes a coefficient as it is printed.
func number(v float64) string { return strconv.FormatFloat(v, 'g', -1, 64) }

// sectionSteps gives what every working on shear begins with.
func (w *webShear) sectionSteps(e *edition, out *working) {
	out.given("f'c", "specified concrete strength", "", e.asStress(w.fc))
	out.given("λ", "factor for lightweight concrete", w.light.clause, asPlain(w.light.factor))
	out.note(w.light.route)
	out.given("bw", "web width", "", e.asLength(w.bw))
	out.given("d", "depth to the centroid of the steel in flexural tension", "", e.asLength(w.d))
}

// steps gives the working of Vc.
func (w *webShear) steps(e *edition, out *working, c *concreteShear, s *sectionShear, enough bool) {
	root := "√f'c"
	if c.rootCapped {
		root = "min(√f'c, " + number(e.materials.rootCap) + ")"
	}
	out.find("r", "root of the concrete strength as used for Vc", "22.5.3.1", root, e.asStress(w.rootUsed))
	switch {
	case c.rootCapped:
		out.note("capped: there are not the least stirrups of 22.5.3.2")
	case w.root > e.materials.rootCap:
		out.note("not capped: there are at least the least stirrups (22.5.3.2)")
	}
	if c.axial != 0 {
		out.given("Nu", "factored axial force, compression positive", "", e.asForce(c.axial))
		out.given("Ag", "gross area, net of hollows", "", e.asArea(w.ag))
	}
	if e.shear.rowsByStirrups {
		w.rowSteps(e, out, c, enough)
	} else {
		w.methodSteps(e, out, c, s)
	}
	if w.joist {
		out.find("Vc", "concrete shear strength of a joist", "9.8.1.5", number(joistShear)+" Vc,0", e.asForce(c.strength))
	}
}

// concreteSymbol is what the rows call their result: Vc, unless it is increased
// afterwards.
func (w *webShear) concreteSymbol() string {
	if w.joist {
		return "Vc,0"
	}
	return "Vc"
}

// rowSteps is the working of Table 22.5.5.1 of 318-19.
func (w *webShear) rowSteps(e *edition, out *working, c *concreteShear, enough bool) {
	r := &e.shear
	plus := ""
	if c.axial != 0 {
		expression := "Nu / (" + number(r.axial) + " Ag)"
		if c.axialCapped {
			expression = "min(" + expression + ", " + number(r.axialMost) + " f'c)"
		}
		out.find("n", "stress added for the axial force", "22.5.5.1.2", expression, e.asStress(c.axialTerm))
		if c.axialCapped {
			out.note("capped")
		}
		plus = " + n"
	}
	out.given("As", "steel on the flexural tension side", "", e.asArea(w.as))
	out.find("ρw", "ratio of that steel to the web", "22.5.5.1", "As / (bw d)", asPlain(w.ratio))
	choice := "Vc,c"
	if enough {
		out.find("Vc,a", "concrete shear strength by row (a)", rowA.clause(),
			"("+number(r.plain)+" λ r"+plus+") bw d", e.asForce(c.a))
		out.find("Vc,b", "concrete shear strength by row (b)", rowB.clause(),
			"("+number(r.byRatio)+" λ ρw^(1/3) r"+plus+") bw d", e.asForce(c.b))
		switch w.row {
		case beam.RowA:
			choice = "Vc,a"
		case beam.RowB:
			choice = "Vc,b"
		default:
			choice = "max(Vc,a, Vc,b)"
		}
	} else {
		size := "√(2 / (1 + d / " + number(r.sizeDepth) + "))"
		if e.system == units.SI {
			size = "√(2 / (1 + 0.004 d))"
		}
		out.find("λs", "size effect factor", "22.5.5.1.3", "min("+size+", 1)", asPlain(w.size))
		out.find("Vc,c", "concrete shear strength by row (c)", rowC.clause(),
			"("+number(r.byRatio)+" λs λ ρw^(1/3) r"+plus+") bw d", e.asForce(c.c))
		out.note("row (c): there are no stirrups, fewer than the least of 9.6.3.4, or they are too far apart to count")
	}
	out.find("Vc,max", "greatest concrete shear strength", "22.5.5.1.1", number(r.most)+" λ r bw d", e.asForce(c.most))
	out.find(w.concreteSymbol(), "concrete shear strength", c.row.clause(), "max(min("+choice+", Vc,max), 0)", e.asForce(c.ordinary))
	out.note(c.row.note())
}

// note says what decided the row.
func (r concreteRow) note() string {
	switch r {
	case rowMost:
		return "the cap governs"
	case rowNone:
		return "axial tension leaves no concrete shear strength"
	case rowA:
		return "row (a)"
	case rowB:
		return "row (b)"
	case rowDetailedA:
		return "the least, row (a)"
	case rowDetailedB:
		return "the least, row (b)"
	case rowDetailedC:
		return "the least, row (c)"
	}
	return ""
}

// methodSteps is the working of 22.5.5.1, 22.5.6.1 and 22.5.7.1 of 318-14.
func (w *webShear) methodSteps(e *edition, out *working, c *concreteShear, s *sectionShear) {
	r := &e.shear
	const meaning = "concrete shear strength"
	symbol := w.concreteSymbol()
	switch {
	case c.axial != 0:
		per, clause := r.compression, rowCompression.clause()
		if c.axial < 0 {
			per, clause = r.tension, rowTension.clause()
		}
		out.find("k", "factor for the axial force", clause, "1 + Nu / ("+number(per)+" Ag)", asPlain(c.axialTerm))
		out.find(symbol, meaning, clause, "max("+number(r.plain)+" k λ r bw d, 0)", e.asForce(c.ordinary))
		out.note(c.row.note())
	case c.row == rowSimplified:
		out.find(symbol, meaning, c.row.clause(), number(r.plain)+" λ r bw d", e.asForce(c.ordinary))
	default:
		out.given("As", "steel on the flexural tension side", "", e.asArea(w.as))
		out.find("ρw", "ratio of that steel to the web", "22.5.5.1", "As / (bw d)", asPlain(w.ratio))
		least := "min(Vc,b, Vc,c)"
		if c.a != 0 {
			out.given("Mu", "factored moment acting with it", "", e.asMoment(s.moment))
			out.find("Vc,a", meaning+" by row (a)", rowDetailedA.clause(),
				"("+number(r.detailed)+" λ r + "+number(r.perRatio)+" ρw Vu d / Mu) bw d", e.asForce(c.a))
			least = "min(Vc,a, Vc,b, Vc,c)"
		}
		out.find("Vc,b", meaning+" by row (b)", rowDetailedB.clause(),
			"("+number(r.detailed)+" λ r + "+number(r.perRatio)+" ρw) bw d", e.asForce(c.b))
		if c.a == 0 {
			out.note("Vu d is at least Mu, so that row (a) is no less than this")
		}
		out.find("Vc,c", meaning+" by row (c)", rowDetailedC.clause(), number(r.greatest)+" λ r bw d", e.asForce(c.c))
		out.find(symbol, meaning, c.row.clause(), least, e.asForce(c.ordinary))
		out.note(c.row.note())
	}
}

// stirrupSteps gives fyt, Av and s.
func (w *webSteel) stirrupSteps(e *edition, out *working) {
	out.given("fyt", "stirrup yield strength as it may be used in shear", e.materials.yieldClause, e.asStress(w.fyt))
	if w.fytCapped {
		out.note("capped: the stirrups' own yield strength is above the greatest that may be used in shear")
	}
	out.given("Av", "area of all legs", "", e.asArea(w.av))
	out.given("s", "spacing along the beam", "", e.asLength(w.s))
	if !w.slope.upright() {
		w.slopeSteps(out)
	}
}

// slopeSteps gives the angle of legs that lean.
func (w *webSteel) slopeSteps(out *working) {
	out.given("sinα", "sine of the angle of the legs with the axis of the beam, "+number(w.slope.degrees)+" degrees", "", asPlain(w.slope.sin))
	out.given("cosα", "its cosine", "", asPlain(w.slope.cos))
}

// inclinedSteps is the working of the greatest spacing of legs that lean.
func (w *webSteel) inclinedSteps(e *edition, heavy bool) []beam.Step {
	var out working
	out.given("d", "depth to the centroid of the steel in flexural tension", "", e.asLength(w.bare.d))
	w.slopeSteps(&out)
	expression := "d / 2 (1 + cosα / sinα)"
	if heavy {
		expression += " / 2"
	}
	out.find("s,max", "greatest spacing along the beam", "9.7.6.2.3", expression, e.asLength(w.mostInclined(heavy)))
	if heavy {
		out.note("the required Vs is above the limit of Table 9.7.6.2.2: halved like the spacings there")
	}
	return out.steps
}

// concreteSteps is the working down to Vc as it counts, after Vu and φ.
func (w *webSteel) concreteSteps(e *edition, out *working, s *sectionShear) {
	out.given("Vu", "factored shear", "", e.asForce(s.shear))
	out.given("φ", "strength reduction factor for shear", "Table 21.2.1", asPlain(w.phi))
	w.counted.sectionSteps(e, out)
	w.counted.steps(e, out, &s.concrete, s, w.enough)
}

// strengthSteps is the working of φVn, with the bent bars that carry shear.
func (w *webSteel) strengthSteps(e *edition, s *sectionShear, bent []bentGroup) []beam.Step {
	var out working
	w.concreteSteps(e, &out, s)
	sum, clause := "Vc", "22.5.1.1"
	if w.steel > 0 {
		w.stirrupSteps(e, &out)
		clause, expression := e.stirrups.strengthClause, "Av fyt d / s"
		if !w.slope.upright() {
			clause, expression = e.stirrups.inclinedClause, "Av fyt (sinα + cosα) d / s"
		}
		out.find("Vs", "shear carried by stirrups", clause, expression, e.asForce(w.steel))
		sum += " + Vs"
	}
	if len(bent) > 0 {
		bentSteps(e, &out, w, bent, s.bent)
		sum += " + Vb"
		clause = e.stirrups.sumClause
	}
	if sum == "Vc" {
		out.find("φVn", "design shear strength, of the concrete alone", "9.5.1.1", "φ Vc", e.asForce(s.design))
		if w.wide {
			out.note("the stirrups are further apart than the greatest spacing of Table 9.7.6.2.2: none is sure to cross a crack, and they do not count")
		}
		if w.flat {
			out.note(noteFlat)
		}
		return out.steps
	}
	out.find("Vn", "nominal shear strength", clause, sum, e.asForce(s.nominal))
	out.find("φVn", "design shear strength", "9.5.1.1", "φ Vn", e.asForce(s.design))
	return out.steps
}

// limitSteps is the working of the section limit.
func (w *webSteel) limitSteps(e *edition, s *sectionShear) []beam.Step {
	var out working
	w.concreteSteps(e, &out, s)
	out.find("Vu,max", "greatest factored shear for the section", "22.5.1.2",
		"φ (Vc + "+number(e.shear.section)+" √f'c bw d)", e.asForce(s.limit))
	return out.steps
}

// leastSteps is the working of whether stirrups are required, and of the least
// of them if there are any.
func (w *webSteel) leastSteps(e *edition, s *sectionShear) []beam.Step {
	r := &e.stirrups
	var out working
	out.given("Vu", "factored shear", "", e.asForce(s.shear))
	out.given("φ", "strength reduction factor for shear", "Table 21.2.1", asPlain(w.phi))
	w.bare.sectionSteps(e, &out)
	const meaning = "shear above which stirrups are required"
	switch {
	case w.exempt != 0:
		w.bare.steps(e, &out, &s.bare, s, false)
		expression := "φ Vc"
		if w.exempt == exemptFibres {
			expression = "min(φ Vc, φ " + number(r.fibreShear) + " √f'c bw d)"
		}
		out.find("Vu,0", meaning, "Table 9.6.3.1", expression, e.asForce(s.trigger))
		out.note(w.exempt.note(e))
	case r.lambdaRoot > 0:
		root := "√f'c"
		if w.bare.rootUsed < w.bare.root {
			root = "min(√f'c, " + number(e.materials.rootCap) + ")"
		}
		factor := "φ "
		if r.lambdaRoot != 1 {
			factor += number(r.lambdaRoot) + " "
		}
		out.find("Vu,0", meaning, "9.6.3.1", factor+"λ "+root+" bw d", e.asForce(s.trigger))
	default:
		w.bare.steps(e, &out, &s.bare, s, false)
		out.find("Vu,0", meaning, "9.6.3.1", number(r.share)+" φ Vc", e.asForce(s.trigger))
	}
	if w.av == 0 {
		return out.steps
	}
	w.stirrupSteps(e, &out)
	out.find("av", "stirrup area provided per length", "", "Av / s", e.asSteel(w.provided))
	out.find("av,a", "least stirrup area per length by concrete strength", r.leastClause+"(a)",
		number(r.root)+" √f'c bw / fyt", e.asSteel(w.byRoot))
	out.find("av,b", "least stirrup area per length", r.leastClause+"(b)",
		number(r.floor)+" bw / fyt", e.asSteel(w.byFloor))
	out.find("av,min", "least stirrup area per length", r.leastClause, "max(av,a, av,b)", e.asSteel(w.least))
	return out.steps
}

// spacingSteps is the working of the greatest spacings along and across.
func (w *webSteel) spacingSteps(e *edition, s *sectionShear) []beam.Step {
	r := &e.stirrups
	const clause = "Table 9.7.6.2.2"
	var out working
	w.concreteSteps(e, &out, s)
	out.find("Vs,req", "shear that stirrups must carry", r.requiredClause, "max(Vu / φ - Vc, 0)", e.asForce(s.needed))
	out.find("Vs,heavy", "required Vs above which spacings are halved", clause,
		number(r.heavy)+" √f'c bw d", e.asForce(w.heavyFrom))
	along, across, most := "d / 2", "d", r.most
	if s.heavy {
		along, across, most = "d / 4", "d / 2", r.mostHeavy
	}
	out.find("s,max", "greatest spacing along the beam", clause, "min("+along+", "+number(most)+")", e.asLength(s.along))
	if s.heavy {
		out.note("the required Vs is above the limit: spacings are halved")
	}
	if r.across {
		out.find("w,max", "greatest distance between legs across the beam", clause,
			"min("+across+", "+number(most)+")", e.asLength(s.across))
	}
	return out.steps
}
