package aci318

import (
	"math"

	"soffit.example/beam"
	"soffit.example/units"
)

// at gives a check its place and combination.
func (w *worstSection) at(c *beam.Check, span int) {
	c.Span, c.At, c.HasAt = span, w.action.At, span > 0
	c.Combination = w.action.Combination
}

// appendChecks appends the checks of a stretch: strength, least stirrups, and
// their spacing along and across the beam.
func (z *webZone) appendChecks(dst []beam.Check) []beam.Check {
	if !z.strength.found {
		return append(dst, beam.Check{
			ID: "shear.strength", Clause: "22.5.1.1", Span: z.span, Outcome: beam.NotApplicable, Reason: "no shear acts",
		})
	}
	dst = z.appendStrength(dst)
	dst = z.appendLeast(dst)
	dst = z.appendHanger(dst)
	if z.zone >= 0 {
		dst = z.appendSpacing(dst)
	}
	return z.appendTorsion(dst)
}

func (z *webZone) appendStrength(dst []beam.Check) []beam.Check {
	e, w := z.e, &z.strength
	c := beam.Check{ID: "shear.strength", Clause: "22.5.1.1", Reason: w.note}
	w.at(&c, z.span)
	c.Compare(e.forceOf(w.values.shear).Amount(), e.forceOf(w.values.design).Amount())
	web := z.webFor(w.sense, w.action.Shear)
	switch {
	case c.Outcome == beam.Fail && web.wide:
		c.Reason = noteTooWide
	case c.Outcome == beam.Fail && web.flat:
		c.Reason = noteFlat
	case z.leaning && web.av == 0:
		c.Reason = noteWayward
	}
	if z.t.Record {
		c.Steps = web.strengthSteps(e, &w.values, z.bentGroups(w))
	}
	return append(dst, c)
}

// appendLeast asks for least stirrups: of a stretch without stirrups, that the
// shear stays below the one that calls for them; of one with stirrups, that
// they are enough where they are called for.
func (z *webZone) appendLeast(dst []beam.Check) []beam.Check {
	e, w := z.e, &z.trigger
	web := z.webFor(w.sense, w.action.Shear)
	c := beam.Check{ID: "shear.minimum-stirrups", Clause: "9.6.3.1"}
	w.at(&c, z.span)
	switch {
	case z.zone < 0:
		c.Reason = w.note
		c.Compare(e.forceOf(w.values.shear).Amount(), e.forceOf(w.values.trigger).Amount())
	case units.AtMost(w.values.shear, w.values.trigger):
		c.Outcome, c.Reason = beam.NotApplicable, noteNotRequired
		if w.values.required {
			c.Reason = noteForStrength
		}
	default:
		c.Clause = e.stirrups.leastClause
		if z.leaning && web.av == 0 {
			c.Reason = noteWayward
		}
		c.Compare(e.steelOf(web.least).Amount(), e.steelOf(web.provided).Amount())
	}
	if z.t.Record {
		c.Steps = web.leastSteps(e, &w.values)
	}
	return append(dst, c)
}

func (z *webZone) appendSpacing(dst []beam.Check) []beam.Check {
	e := z.e
	along := beam.Check{ID: "shear.spacing-along", Clause: "Table 9.7.6.2.2", Span: z.span}
	across := beam.Check{ID: "shear.spacing-across", Clause: "Table 9.7.6.2.2", Span: z.span}
	if !z.along.found {
		along.Outcome, along.Reason = beam.NotApplicable, noteNotRequired
		across.Outcome, across.Reason = beam.NotApplicable, noteNotRequired
	} else {
		web := z.webFor(z.along.sense, z.along.action.Shear)
		z.along.at(&along, z.span)
		along.Compare(e.lengthOf(web.s).Amount(), e.lengthOf(z.along.values.along).Amount())
		z.across.at(&across, z.span)
		across.Compare(z.legs.Amount(), e.lengthOf(z.across.values.across).Amount())
		if z.t.Record {
			along.Steps = web.spacingSteps(e, &z.along.values)
			across.Steps = z.webFor(z.across.sense, z.across.action.Shear).spacingSteps(e, &z.across.values)
		}
	}
	dst = append(dst, along)
	if e.stirrups.across {
		dst = append(dst, across)
	}
	if z.leaning {
		dst = z.appendSlope(dst)
	}
	return dst
}

// appendSlope appends what is asked of stirrups that lean.
func (z *webZone) appendSlope(dst []beam.Check) []beam.Check {
	e, web := z.e, &z.web[senseIndex(z.strength.sense)]
	c := beam.Check{ID: "shear.stirrup-angle", Clause: e.stirrups.slopeClause, Span: z.span, Reason: noteFlat}
	c.Compare(units.Plain(leastSlope), units.Plain(web.slope.degrees))
	dst = append(dst, c)
	c.ID, c.Clause, c.Reason = "shear.spacing-inclined", "9.7.6.2.3", noteInclined
	c.Compare(e.lengthOf(web.s).Amount(), e.lengthOf(web.mostInclined(z.heavy)).Amount())
	if z.t.Record {
		c.Steps = web.inclinedSteps(e, z.heavy)
	}
	return append(dst, c)
}

// appendLimit appends the section limit of 22.5.1.2, once for a span.
func appendLimit(dst []beam.Check, e *edition, t *beam.Trial, span int, w *worstSection, web *webSteel) []beam.Check {
	c := beam.Check{ID: "shear.section-limit", Clause: "22.5.1.2", Span: span}
	if !w.found {
		c.Outcome, c.Reason = beam.NotApplicable, "no shear acts"
		return append(dst, c)
	}
	w.at(&c, span)
	c.Reason = w.note
	c.Compare(e.forceOf(w.values.shear).Amount(), e.forceOf(w.values.limit).Amount())
	if t.Record {
		c.Steps = web.limitSteps(e, &w.values)
	}
	return append(dst, c)
}

// Bar numbers of Table 25.3.2 and of 25.7.1.3.
const (
	mostStirrup  = 8 // the largest with a standard stirrup bend
	smallStirrup = 5 // developed by its hook alone, whatever its strength
)

// judgeStirrups appends the checks on the stirrups of zone k themselves, unless
// they are like those of the zone before.
func (e *edition) judgeStirrups(dst []beam.Check, t *beam.Trial, k, before int) []beam.Check {
	z, size := &t.Zones[k], &t.ZoneBar[k]
	if before >= 0 && t.ZoneBar[before] == *size && t.Zones[before].Legs == z.Legs {
		return dst
	}
	number := barNumber(size.Diameter)
	c := beam.Check{ID: "shear.stirrup-size", Clause: "Table 25.3.2", Span: z.Span}
	c.Compare(units.Plain(float64(number)), units.Plain(mostStirrup))
	dst = append(dst, c)

	h := e.stirrupHook(t, size.Diameter)
	c = beam.Check{ID: "shear.stirrup-anchorage", Clause: "25.7.1.3", Span: z.Span}
	if number <= smallStirrup || units.AtMost(h.fyt, e.stirrups.hookYield) {
		c.Outcome, c.Reason = beam.NotApplicable, noteHook
	} else {
		c.Compare(e.lengthOf(h.needed).Amount(), e.lengthOf(h.available).Amount())
		if t.Record {
			c.Steps = h.steps(e)
		}
	}
	dst = append(dst, c)

	if z.Legs > 2 {
		c = beam.Check{ID: "shear.leg-bars", Clause: "25.7.1.2", Span: z.Span}
		c.Compare(units.Plain(float64(z.Legs)), units.Plain(float64(min(outerBars(&t.Bottom), outerBars(&t.Top)))))
		dst = append(dst, c)
	}
	return dst
}

// outerBars is the number of bars in the layer nearest a face, round which
// stirrup legs can be bent.
func outerBars(f *beam.FaceSteel) int {
	if len(f.Fit.Layers) == 0 {
		return 0
	}
	return f.Fit.Layers[0].Count
}

// barNumber is the number of an ASTM bar: its nominal diameter in eighths of
// an inch. The soft-metric sizes are the same bars.
func barNumber(diameter units.Length) int {
	return int(math.Round(diameter.In(units.Inch) * 8))
}

// stirrupHook is the embedment of a larger stirrup beyond mid-depth
// (25.7.1.3(b)), in the units of the edition.
type stirrupHook struct {
	diameter, fyt     float64
	root              float64
	light             lightness
	depth, cover      float64
	needed            float64
	available         float64
	fytCapped, capped bool
}

func (e *edition) stirrupHook(t *beam.Trial, diameter units.Length) stirrupHook {
	b := &t.Brief
	yield, capped := e.shearYield(b.Reinforcement.StirrupYield)
	h := stirrupHook{
		diameter: e.lengthIn(diameter), fyt: e.stressIn(yield), fytCapped: capped,
		root: e.sqrtStrength(b.Concrete.Strength), light: e.lightness(&b.Concrete),
		depth: e.lengthIn(b.Section.Depth), cover: e.lengthIn(t.Cover),
	}
	if h.root > e.materials.rootCap {
		h.root, h.capped = e.materials.rootCap, true
	}
	h.needed = e.stirrups.embedment * h.diameter * h.fyt / (h.light.factor * h.root)
	h.available = h.depth/2 - h.cover
	return h
}

func (h *stirrupHook) steps(e *edition) []beam.Step {
	var out working
	out.given("db", "stirrup diameter", "", e.asLength(h.diameter))
	out.given("fyt", "stirrup yield strength as used in shear", e.materials.yieldClause, e.asStress(h.fyt))
	out.given("λ", "factor for lightweight concrete", h.light.clause, asPlain(h.light.factor))
	out.note(h.light.route)
	out.given("r", "root of the concrete strength", "25.4.1.4", e.asStress(h.root))
	if h.capped {
		out.note("capped")
	}
	out.given("h", "overall depth", "", e.asLength(h.depth))
	out.given("c", "clear cover to the stirrup", "", e.asLength(h.cover))
	out.find("e,min", "least embedment from mid-depth to the outside of the hook", "25.7.1.3(b)",
		number(e.stirrups.embedment)+" db fyt / (λ r)", e.asLength(h.needed))
	out.find("e", "embedment provided", "", "h / 2 - c", e.asLength(h.available))
	return out.steps
}
