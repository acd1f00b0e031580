package aci318

import (
	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/units"
)

// Longitudinal bars bent across the web, 22.5.10.6 of 318-14 and 22.5.8.6 of
// 318-19. They count for strength alone: least stirrups are stirrups.
const (
	leastBend = 30.0      // degrees with the axis of the beam
	effective = 3.0 / 4.0 // of the slope, its middle
)

// bentGroup is a group of bars all bent at one place, or a series of such
// groups, in the units of the edition.
type bentGroup struct {
	area     float64 // of one group
	fy       float64 // as it may be used in shear
	fyCapped bool
	slope    slope
	height   float64 // of the slope, between the axes of the bar above and below
	spacing  float64 // of a series
	series   bool
}

// bentGroup is the i-th of a trial's bent bars. They run from the level of the
// first layer at one face to that at the other.
func (e *edition) bentGroup(t *beam.Trial, i int) bentGroup {
	b, size := &t.Bent[i], &t.BentBar[i]
	yield, capped := e.shearYield(t.Brief.Reinforcement.Yield)
	inside := t.Brief.Section.Depth.Sub(t.Cover.Add(t.Stirrup.Diameter).Scale(2)).Sub(size.Diameter)
	return bentGroup{
		area: e.areaIn(bars.TotalArea(bars.Group{Size: *size, Count: b.Count})),
		fy:   e.stressIn(yield), fyCapped: capped, slope: slopeOf(b.Angle),
		height: max(0, e.lengthIn(inside)), spacing: e.lengthIn(b.Spacing), series: b.Bends > 1,
	}
}

// reach is how far from the place where it crosses mid-depth a slope is
// effective, along the beam: an upright section within it cuts the middle of
// the slope.
func (g *bentGroup) reach() float64 {
	return effective / 2 * g.height * g.slope.cos / g.slope.sin
}

// most is the greatest spacing of a series for a depth d: every line at 45
// degrees from mid-depth to the tension steel crosses a slope where it is
// effective (9.7.6.2.3).
func (g *bentGroup) most(d float64, heavy bool) float64 {
	most := min(effective/2*g.height, d/2) * (1 + g.slope.cos/g.slope.sin)
	if heavy {
		most /= 2
	}
	return most
}

// share is what the group carries at a section within its reach; nothing if it
// is too flat, or a series too wide for a depth d.
func (g *bentGroup) share(d float64) bentShare {
	switch {
	case !units.AtMost(leastBend, g.slope.degrees):
		return bentShare{}
	case !g.series:
		return bentShare{single: g.single()}
	case units.AtMost(g.spacing, g.most(d, false)):
		return bentShare{perDepth: g.perDepth()}
	}
	return bentShare{}
}

func (g *bentGroup) single() float64   { return g.area * g.fy * g.slope.sin }
func (g *bentGroup) perDepth() float64 { return g.area * g.fy * g.slope.lever() / g.spacing }

// bentShare is what bent bars carry at a section: single groups a force, which
// 3√f'c bw d limits for all of them together, series a force for each length
// of d.
type bentShare struct{ single, perDepth float64 }

func (b bentShare) add(c bentShare) bentShare {
	return bentShare{b.single + c.single, b.perDepth + c.perDepth}
}

// at is Vs of the bent bars of a section.
func (b bentShare) at(w *webSteel) float64 {
	return min(b.single, w.bentMost) + b.perDepth*w.bare.d
}

// rises says which end of the span a bar rises towards: it meets the cracks of
// a shear that is positive if that is the left one, of a negative one if not.
const (
	risesLeft = iota
	risesRight
)

func rises(b *beam.BentBars) int {
	if b.Rises == "left" {
		return risesLeft
	}
	return risesRight
}

// against is the slope that meets the cracks of a shear.
func against(shear units.Force) int {
	if shear.Less(units.Force{}) {
		return risesRight
	}
	return risesLeft
}

// bentReach is the length of the span over which the i-th of the bent bars of a
// trial are effective.
func (e *edition) bentReach(t *beam.Trial, i int) (from, to units.Length) {
	b, g := &t.Bent[i], e.bentGroup(t, i)
	reach := e.lengthOf(g.reach())
	last := b.At.Add(b.Spacing.Scale(float64(b.Bends - 1)))
	return b.At.Sub(reach), last.Add(reach)
}

// hasBent reports whether bars are bent across the web of a span.
func hasBent(t *beam.Trial, span int) bool {
	for i := range t.Bent {
		if t.Bent[i].Span == span {
			return true
		}
	}
	return false
}

// bentDepth is the lesser d of the two senses, by which the spacing of a series
// is judged.
func (e *edition) bentDepth(t *beam.Trial) float64 {
	a, b := t.EffectiveDepth(beam.Positive), t.EffectiveDepth(beam.Negative)
	if a.IsZero() || !b.IsZero() && b.Less(a) {
		a = b
	}
	return e.lengthIn(a)
}

// bentAt is what bars rising to either end carry at a place strictly within
// their reach.
func (e *edition) bentAt(t *beam.Trial, span int, at units.Length) (share [2]bentShare) {
	d := e.bentDepth(t)
	for i := range t.Bent {
		if e.bentCounts(t, i, span, at) {
			g := e.bentGroup(t, i)
			way := rises(&t.Bent[i])
			share[way] = share[way].add(g.share(d))
		}
	}
	return share
}

// bentCounts reports whether a place lies within the reach of the i-th of the
// bent bars.
func (e *edition) bentCounts(t *beam.Trial, i, span int, at units.Length) bool {
	if t.Bent[i].Span != span {
		return false
	}
	from, to := e.bentReach(t, i)
	return from.Less(at) && at.Less(to)
}

// What is said of bent bars and of stirrups that lean.
const (
	noteBent      = "bent bars count within the central three quarters of their slope, against the shear that they rise against"
	noteFlatBend  = "bent bars flatter than this do not count"
	noteWideBends = "groups wider apart than this do not count: every line at 45 degrees from mid-depth to the tension steel must cross the middle three quarters of a slope"
	noteWayward   = "the shear acts against the lean of the stirrups, which do not count here"
	noteFlat      = "stirrups flatter than this do not count"
	noteInclined  = "every line at 45 degrees from mid-depth to the tension steel must cross a stirrup"
)

// appendBent appends the checks on the bent bars of a span themselves; heavy
// says that the required Vs somewhere in it halves spacings.
func (e *edition) appendBent(dst []beam.Check, t *beam.Trial, span int, heavy bool) []beam.Check {
	for i := range t.Bent {
		if t.Bent[i].Span != span {
			continue
		}
		g := e.bentGroup(t, i)
		c := beam.Check{ID: "shear.bent-angle", Clause: e.stirrups.bentSlopeClause, Span: span, At: t.Bent[i].At, HasAt: true, Reason: noteBent}
		c.Compare(units.Plain(leastBend), units.Plain(g.slope.degrees))
		if c.Outcome == beam.Fail {
			c.Reason = noteFlatBend
		}
		dst = append(dst, c)
		if !g.series {
			continue
		}
		c.ID, c.Clause, c.Reason = "shear.bent-spacing", "9.7.6.2.3", noteWideBends
		d := e.bentDepth(t)
		c.Compare(e.lengthOf(g.spacing).Amount(), e.lengthOf(g.most(d, heavy)).Amount())
		if t.Record {
			c.Steps = g.spacingSteps(e, d, heavy)
		}
		dst = append(dst, c)
	}
	return dst
}

// spacingSteps is the working of the greatest spacing of a series.
func (g *bentGroup) spacingSteps(e *edition, d float64, heavy bool) []beam.Step {
	var out working
	out.given("hs", "height of the slope, between the axes of the bar", "", e.asLength(g.height))
	out.given("d", "depth to the centroid of the steel in flexural tension", "", e.asLength(d))
	out.given("sinα", "sine of the angle with the axis of the beam", "", asPlain(g.slope.sin))
	out.given("cosα", "its cosine", "", asPlain(g.slope.cos))
	out.find("y", "depth below mid-depth to which a line at 45 degrees may count on the slope", "9.7.6.2.3",
		"min("+number(effective/2)+" hs, d / 2)", e.asLength(min(effective/2*g.height, d/2)))
	expression := "y (1 + cosα / sinα)"
	if heavy {
		expression += " / 2"
	}
	out.find("s,max", "greatest spacing of the groups", "9.7.6.2.3", expression, e.asLength(g.most(d, heavy)))
	if heavy {
		out.note("the required Vs is above the limit of Table 9.7.6.2.2: halved like the spacings there")
	}
	return out.steps
}

// bentSteps is the working of Vs of bent bars: of those of a list.
func bentSteps(e *edition, out *working, w *webSteel, groups []bentGroup, total float64) {
	r := &e.stirrups
	singles, sum := "", ""
	for i := range groups {
		g, n := &groups[i], number(float64(i+1))
		out.given("Ab,"+n, "area of a group of bent bars", "", e.asArea(g.area))
		out.given("fb,"+n, "their yield strength as it may be used in shear", e.materials.yieldClause, e.asStress(g.fy))
		if g.fyCapped {
			out.note("capped")
		}
		out.given("sinα,"+n, "sine of their angle with the axis of the beam, "+number(g.slope.degrees)+" degrees", "", asPlain(g.slope.sin))
		symbol := "Vb," + n
		if !g.series {
			out.find(symbol, "shear carried by the group", r.bentSingleClause, "Ab,"+n+" fb,"+n+" sinα,"+n, e.asForce(g.single()))
			singles = plus(singles, symbol)
			continue
		}
		out.given("cosα,"+n, "its cosine", "", asPlain(g.slope.cos))
		out.given("sb,"+n, "spacing of the groups", "", e.asLength(g.spacing))
		out.find(symbol, "shear carried by the series", r.bentSeriesClause,
			"Ab,"+n+" fb,"+n+" (sinα,"+n+" + cosα,"+n+") d / sb,"+n, e.asForce(g.perDepth()*w.bare.d))
		sum = plus(sum, symbol)
	}
	if singles != "" {
		sum = plus("min("+singles+", "+number(r.bentMost)+" √f'c bw d)", sum)
	}
	out.find("Vb", "shear carried by bent bars", r.bentSingleClause, sum, e.asForce(total))
}

// plus joins two sums.
func plus(a, b string) string {
	if a == "" || b == "" {
		return a + b
	}
	return a + " + " + b
}
