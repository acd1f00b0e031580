package aci318

import (
	"fmt"
	"math"
	"slices"

	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// queryTorsion is the section of a query in torsion, in the units of the
// edition.
type queryTorsion struct {
	e        *edition
	q        *beam.SectionQuery
	strength torsionStrength
	torque   sectionTorque
	web      *webSteel
	shear    *sectionShear

	caged  bool // there are stirrups whose place is known
	cage   torsionCage
	legs   float64
	leg    float64 // of an outer leg: area over spacing; zero where it does not count
	unfit  string
	values sectionTorsion // of a torque, or of none

	parts   []mechanics.Part
	yield   units.Stress // the least of the longitudinal steel,
	fy      float64      // and as it may be used in torsion
	pull    float64      // Al fy
	least   float64      // Al,min fy
	halves  [2]queryHalf
	surplus float64 // Al left over by bending
}

// queryHalf is the longitudinal steel of the lower or of the upper half of the
// section. Each half of a stirrup has half its perimeter, and half of Al.
type queryHalf struct {
	area    float64
	first   float64 // moment of that about the top face
	bending float64 // of it in tension under the moment and the axial force
	relief  float64 // what flexural compression takes over, 9.5.4.5
	need    float64
	broken  string
}

// queryTorsion evaluates a query. A fault is a value without which the torque
// asked for cannot be judged.
func (e *edition) queryTorsion(q *beam.SectionQuery, g *beam.Geometry, web *webSteel, s *sectionShear, f *beam.FlexureStrength) (queryTorsion, []beam.Fault) {
	var faults []beam.Fault
	t := queryTorsion{e: e, q: q, web: web, shear: s, parts: g.Parts, strength: e.torsionStrength(&q.Section, g, &q.Concrete, q.Demand.Axial)}
	a := beam.Action{Torque: q.Demand.Torque}
	if q.Demand.Path == beam.CompatibilityTorque {
		a.Compatible = a.Torque
	}
	t.torque = t.strength.torque(e, &a)
	angle := q.Readings.TorsionAngle
	if fault, wrong := angleFault(angle); wrong {
		faults = append(faults, fault)
	}
	ties := q.Stirrups
	if ties != nil && !t.torque.neglected {
		for _, v := range []struct {
			path, what string
			value      units.Length
		}{{"/stirrups/cover", "cover", ties.Cover}, {"/stirrups/diameter", "diameter", ties.Diameter}} {
			if v.value.IsZero() {
				faults = append(faults, beam.Fault{Path: v.path, Detail: "the torque must be designed for, and the stirrups' " + v.what + " is missing", Allowed: "above zero"})
			}
		}
	}
	if ties == nil || ties.Cover.IsZero() || ties.Diameter.IsZero() || len(faults) > 0 {
		return t, faults
	}
	t.caged = true
	t.cage = e.torsionCage(&q.Section, g, &t.strength, ties.Cover, ties.Diameter, ties.Yield, angle)
	t.legs = float64(max(2, ties.Legs))
	switch {
	case ties.Open:
		t.unfit = noteOpen
	case ties.Angle != 0 && ties.Angle != 90:
		t.unfit = noteTorsionInclined
	default:
		t.leg = e.areaIn(ties.Area) / t.legs / e.lengthIn(ties.Spacing)
	}
	t.values = t.cage.at(t.torque, web, s, t.legs, 0)
	t.longitudinal(f)
	return t, nil
}

// angleFault is an angle of the compression diagonals outside 22.7.6.1.2.
func angleFault(angle float64) (fault beam.Fault, wrong bool) {
	if angle == 0 || units.AtMost(flattestDiagonal, angle) && units.AtMost(angle, steepestDiagonal) {
		return fault, false
	}
	return beam.Fault{
		Path: "/torsion_angle", Detail: fmt.Sprintf("angle is %g degrees", angle),
		Allowed: fmt.Sprintf("%g to %g degrees (22.7.6.1.2)", flattestDiagonal, steepestDiagonal),
	}, true
}

// longitudinal shares the layers between the halves and finds what each needs.
func (t *queryTorsion) longitudinal(f *beam.FlexureStrength) {
	e, q := t.e, t.q
	depth := e.lengthIn(q.Section.Depth)
	t.yield = q.Layers[0].Yield
	for _, l := range q.Layers {
		t.yield = t.yield.Min(l.Yield)
		at, area := e.lengthIn(l.Depth), e.areaIn(l.Area)
		lower := 0.5 // of a layer at mid-depth
		if at != depth/2 {
			lower = 0
			if at > depth/2 {
				lower = 1
			}
		}
		t.halves[0].take(lower*area, at)
		t.halves[1].take((1-lower)*area, at)
	}
	t.fy = e.torsionYield(t.yield)
	if t.cage.area > 0 && !t.torque.neglected {
		t.pull, t.least = t.cage.pullFor(t.cage.legFor(t.torque.used))
	}
	tension := senseIndex(q.Bending)
	pulling, pressed := &t.halves[tension], &t.halves[1-tension]
	if q.Demand.Axial.Compare(units.Force{}) < 0 {
		t.pullBoth(f, pulling, pressed)
	} else {
		pulling.bend(t, f)
		pressed.press(t, f, math.Abs(e.momentIn(q.Demand.Moment)))
	}
	t.surplus = math.Inf(1)
	for i := range t.halves {
		h := &t.halves[i]
		share, least := max(t.pull, t.least)/t.fy/2, t.least/t.fy/2
		h.need = max(share+h.bending-h.relief, least)
		t.surplus = min(t.surplus, max(0, 2*(h.area-h.bending+min(h.relief, max(0, share-least)))))
	}
}

func (h *queryHalf) take(area, at float64) {
	h.area += area
	h.first += area * at
}

// bend finds the steel that the moment takes of the half in tension: a moment
// below the strength takes at most that share of the tension steel, as
// required steel grows faster than the moment.
func (h *queryHalf) bend(t *queryTorsion, f *beam.FlexureStrength) {
	e, d := t.e, &t.q.Demand
	moment, design := math.Abs(e.momentIn(d.Moment)), e.momentIn(f.Design)
	switch {
	case moment == 0:
	case !units.AtMost(moment, design):
		h.broken = noteBeyondBending
		h.bending = h.area
	default:
		h.bending = e.areaIn(f.TensionSteel) * moment / design
	}
}

// press finds the relief of the half in compression by a moment about the
// tension steel.
func (h *queryHalf) press(t *queryTorsion, f *beam.FlexureStrength, moment float64) {
	if lever := t.e.lengthIn(f.EffectiveDepth); lever > 0 {
		h.relief = moment / (creditShare * lever * t.fy)
	}
}

// pullBoth shares a moment and an axial tension between the halves. Where the
// tension acts beyond the steel of the half that the moment pulls, that half
// needs the steel of 22.2 for the moment about it and for the tension. Where it
// acts between the steel of both, all of the section is in tension: each takes
// its part by the lever rule, and nothing is relieved.
func (t *queryTorsion) pullBoth(f *beam.FlexureStrength, pulling, pressed *queryHalf) {
	e, q := t.e, t.q
	if pulling.area == 0 || pressed.area == 0 { // refused for that
		return
	}
	moment, tension := math.Abs(e.momentIn(q.Demand.Moment)), -e.forceIn(q.Demand.Axial)
	if !units.AtMost(moment, e.momentIn(f.Design)) {
		pulling.broken = noteBeyondBending
	}
	z := e.sizing(t.parts, q.Bending, q.Concrete.Strength, t.yield, units.Length{}, f.ExtremeDepth, q.Readings.RoundedYield)
	top := pressed.first / pressed.area
	z.depth = pulling.first / pulling.area
	if z.hogging {
		z.depth, top = z.height-z.depth, z.height-top
	}
	z.extreme = max(z.extreme, z.depth)
	gross, first := z.concrete(z.height)
	about := moment - tension*(z.depth-first/gross)
	if about <= 0 {
		force := (moment + tension*(first/gross-top)) / (z.depth - top)
		by := z.reduction.tension * z.fy
		pulling.bending, pressed.bending = max(0, force)/by, max(0, tension-force)/by
		return
	}
	r := z.tension(about)
	if !r.ok {
		pulling.broken, pulling.bending = noteBeyondBending, pulling.area
		return
	}
	pulling.bending = r.area + tension/(r.phi*z.fy)
	pressed.press(t, f, about)
}

// answer gives the strength with what is known of it.
func (t *queryTorsion) answer() beam.TorsionStrength {
	e, s, c := t.e, &t.strength, &t.cage
	out := beam.TorsionStrength{
		Area: e.areaOf(s.enclosed), Perimeter: e.lengthOf(s.perimeter), FlangeCounted: s.counted, Hollow: s.hollow,
		Threshold: e.momentOf(s.threshold), Cracking: e.momentOf(s.cracking), Phi: s.phi,
		Torque: e.momentOf(t.torque.used), Shed: e.momentOf(t.torque.shed), MayBeNeglected: t.torque.neglected,
	}
	say := func(when bool, note string) {
		if when {
			out.Notes = append(out.Notes, note)
		}
	}
	say(s.rootCapped, "√f'c is capped in threshold and cracking torsion, whatever the stirrups (22.7.2.1)")
	say(t.torque.shed > 0, noteShed)
	if !t.caged {
		say(t.q.Stirrups == nil, "without closed stirrups a section has no strength in torsion beyond its threshold")
		say(t.q.Stirrups != nil, "the cover and the diameter of the stirrups say what they enclose, and one of them is not given")
		return out
	}
	out.StirrupArea, out.StirrupPerimeter, out.FlowArea, out.Angle = e.areaOf(c.area), e.lengthOf(c.perimeter), e.areaOf(c.flow), c.angle
	out.GreatestSpacing, out.MinimumTransverse = e.lengthOf(c.along), e.steelOf(t.web.least)
	out.OuterLegProvided = e.steelOf(t.leg)
	say(t.unfit != "", t.unfit)
	say(t.values.broken != "", t.values.broken)
	say(c.fytCapped, "the stirrups count with "+e.stress.Format(e.stressOf(c.fyt))+" of their yield strength ("+e.materials.yieldClause+")")
	if t.values.broken != "" {
		return out
	}
	if !t.torque.neglected {
		v := &t.values
		out.Section, out.SectionLimit = e.stressOf(v.stress), e.stressOf(v.limit)
		out.Transverse, out.OuterLeg = e.steelOf(v.leg), e.steelOf(v.outer)
		out.Longitudinal, out.MinimumLongitudinal = e.areaOf(max(t.pull, t.least)/t.fy), e.areaOf(t.least/t.fy)
	}
	nominal := t.nominal()
	out.Nominal, out.Design = e.momentOf(nominal), e.momentOf(s.phi*nominal)
	return out
}

// nominal is Tn of 22.7.6.1 by what shear leaves of the outer legs and bending
// of the longitudinal steel.
func (t *queryTorsion) nominal() float64 {
	c := &t.cage
	leg := max(0, t.leg-t.values.shear/t.legs)
	byLegs := 2 * c.flow * leg * c.fyt * c.cot
	byBars := 2 * c.flow * t.surplus * t.fy / (c.perimeter * c.cot)
	return min(byLegs, byBars)
}

// checks judges a torque.
func (t *queryTorsion) checks() []beam.Check {
	e, d := t.e, &t.q.Demand
	if d.Torque.IsZero() {
		return nil
	}
	var out []beam.Check
	check := func(id, clause string) *beam.Check {
		out = append(out, beam.Check{ID: id, Clause: clause, Combination: d.Name})
		return &out[len(out)-1]
	}
	c := check("torsion.threshold", "9.5.4.1")
	c.Compare(e.momentOf(t.torque.most()).Amount(), e.momentOf(t.strength.phi*t.strength.threshold).Amount())
	if t.torque.neglected {
		c.Reason = "below its threshold the torque may be neglected"
		return out
	}
	c.Outcome, c.Reason = beam.NotApplicable, noteDesignedFor
	if !t.caged {
		refuse(check("torsion.closed", "25.7.1.6"), "there are no stirrups, and the torque needs closed ones")
		return out
	}
	v := &t.values
	section, transverse := beam.Check{ID: "torsion.section", Clause: "22.7.7.1"}, beam.Check{ID: "torsion.transverse", Clause: "9.5.4.3"}
	section.Combination, transverse.Combination = d.Name, d.Name
	if v.broken != "" {
		refuse(&section, v.broken)
		refuse(&transverse, v.broken)
		return append(out, section, transverse)
	}
	section.Compare(e.stressOf(v.stress).Amount(), e.stressOf(v.limit).Amount())
	transverse.Compare(e.steelOf(v.outer).Amount(), e.steelOf(t.leg).Amount())
	if v.shed > 0 {
		transverse.Reason = noteShed
	}
	if t.unfit != "" {
		transverse.Reason = t.unfit
	}
	out = append(out, section, transverse)
	c = check("torsion.minimum-stirrups", "9.6.4.2")
	c.Compare(e.steelOf(t.web.least).Amount(), e.steelOf(t.web.provided).Amount())
	c = check("torsion.spacing-along", "9.7.6.3.3")
	c.Compare(t.q.Stirrups.Spacing.Amount(), e.lengthOf(t.cage.along).Amount())
	c = check("torsion.closed", "25.7.1.6")
	wrong := 0.0
	if t.unfit != "" {
		wrong, c.Reason = 1, t.unfit
	}
	c.Compare(units.Plain(wrong), units.Plain(0))
	if t.cage.voids {
		c = check("torsion.wall", "9.7.6.3.4")
		c.Compare(e.lengthOf(t.cage.wallNeeded).Amount(), e.lengthOf(t.cage.wall).Amount())
	}
	for i, face := range [2]beam.Face{beam.Bottom, beam.Top} {
		h := &t.halves[i]
		c = check(torsionFaceIDs[i], "9.5.4.3")
		c.Face = face
		c.Compare(e.areaOf(h.need).Amount(), e.areaOf(h.area).Amount())
		switch {
		case h.broken != "":
			refuse(c, h.broken)
		case h.area == 0:
			refuse(c, "no longitudinal steel lies in this half of the section")
		}
	}
	return append(out, t.arrangement()...)
}

// arrangement says what of 9.7.5 layers of steel cannot show. Neither do they
// show all bars: those along the sides may be left out where bending does
// without them.
func (t *queryTorsion) arrangement() []beam.Check {
	e := t.e
	depths := make([]units.Length, len(t.q.Layers))
	for i, l := range t.q.Layers {
		depths[i] = l.Depth
	}
	slices.SortFunc(depths, units.Length.Compare)
	var widest units.Length
	for i := range depths[1:] {
		widest = widest.Max(depths[i+1].Sub(depths[i]))
	}
	limit := e.lengthOf(e.torsion.around)
	apart := "layers do not say how far bars are apart round the section: no more than " + e.length.Format(limit)
	if !widest.AtMost(limit) {
		apart += "; they leave " + e.length.Format(widest) + " for bars along the sides to lie in"
	}
	out := []beam.Check{
		beam.NotJudgedCheck("torsion.longitudinal-spacing", "9.7.5.1", apart),
		beam.NotJudgedCheck("torsion.corners", "9.7.5.1", "layers do not say whether a bar lies in each corner of the closed stirrups"),
		beam.NotJudgedCheck("torsion.bar-diameter", "9.7.5.2",
			"layers do not say how thick their bars are: at least "+e.length.Format(e.leastTorsionBar(t.q.Stirrups.Spacing))),
	}
	for i := range out {
		out[i].Combination = t.q.Demand.Name
	}
	return out
}
