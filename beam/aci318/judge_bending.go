package aci318

import (
	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// senseIDs are the ids of the checks of one sense of bending.
type senseIDs struct{ strength, strain, minimum, crossCheck string }

var bendingIDs = [...]senseIDs{
	beam.Positive: {"flexure.positive", "flexure.strain.positive", "flexure.minimum.positive", "flexure.cross-check.positive"},
	beam.Negative: {"flexure.negative", "flexure.strain.negative", "flexure.minimum.negative", "flexure.cross-check.negative"},
}

// judgeBending judges both senses of bending. Bars run the whole length, so
// that each sense is judged where it bends most between support faces
// (9.4.2.1), or at the worst of the demands given.
func (e *edition) judgeBending(dst []beam.Check, t *beam.Trial) []beam.Check {
	for s := beam.Positive; s <= beam.Negative; s++ {
		a, bent := greatestAction(t.Problem, s)
		if !bent {
			dst = append(dst, beam.NotApplicableCheck(bendingIDs[s].strength, "9.5.1.1", notBent(s)))
			continue
		}
		dst = e.judgeSense(dst, t, s, &a)
	}
	dst = e.judgeTension(dst, t)
	dst = e.judgeGrades(dst, t)
	return e.judgeTorsionBars(dst, t)
}

func notBent(s beam.Sense) string {
	if s == beam.Negative {
		return "nothing bends the beam with tension at the top between support faces"
	}
	return "nothing bends the beam with tension at the bottom between support faces"
}

// greatestAction is the action with the largest moment of a sense between
// support faces, over all spans, or among the demands.
func greatestAction(p *beam.Problem, s beam.Sense) (worst beam.Action, bent bool) {
	consider := func(a beam.Action) {
		if !bent || worst.Moment.Abs().Less(a.Moment.Abs()) {
			worst, bent = a, true
		}
	}
	for span := 1; span <= p.Forces.Spans(); span++ {
		from, to := p.Faces(span)
		if a, ok := p.Forces.Moment(s, span, from, to); ok {
			consider(a)
		}
	}
	for _, d := range p.Forces.Demands() {
		if s == beam.Positive == (d.Moment.Compare(units.Moment{}) > 0) && !d.Moment.IsZero() {
			consider(d)
		}
	}
	return worst, bent
}

// greatestMoment is the magnitude of greatestAction's moment.
func greatestMoment(p *beam.Problem, s beam.Sense) (units.Moment, bool) {
	a, bent := greatestAction(p, s)
	return a.Moment.Abs(), bent
}

// checkAt starts a check of a sense at an action.
func checkAt(id, clause string, s beam.Sense, a *beam.Action) beam.Check {
	return beam.Check{
		ID: id, Clause: clause, Span: a.Span, At: a.At, HasAt: a.Span > 0,
		Face: s.TensionFace(), Combination: a.Combination,
	}
}

// usage is the action that uses a sense of bending most, and the strength that
// it meets.
type usage struct {
	beam.Action
	flexure
	ok bool // false: nothing balances the section under the action

	// The least strain of all actions, and the axial force that gives it.
	least      flexure
	leastUnder beam.Action
	pulled     bool // an axial tension acts in this sense
	tried      bool // an axial force or more bars were tried, so that the trial holds another equilibrium
}

// use finds the worst action of a sense. An axial force takes from the strength
// and from the strain what it does, and adds nothing (9.5.2.1).
func (e *edition) use(t *beam.Trial, s beam.Sense, greatest beam.Action) (w usage) {
	w.Action = greatest
	w.flexure, w.ok = e.trialFlexure(t, s)
	w.least, w.leastUnder = w.flexure, greatest
	if !w.ok {
		return w
	}
	beyond := beyondSpread(t, s)
	if beyond {
		w.strain(e, t, s, units.Force{}, &greatest)
	}
	worst := ratio(greatest.Moment.Abs().In(units.NewtonMetre), w.design.In(units.NewtonMetre))
	for _, d := range t.Forces.Demands() {
		if d.Axial.IsZero() || d.Moment.IsZero() || (s == beam.Positive) != (d.Moment.Compare(units.Moment{}) > 0) {
			continue
		}
		w.pulled = w.pulled || d.Axial.Compare(units.Force{}) < 0
		f, ok := e.trialUnder(t, s, d.Axial)
		w.tried = true
		if !ok {
			w.Action, w.ok = d, false
			return w
		}
		w.strained(&f, &d)
		if beyond {
			w.strain(e, t, s, d.Axial, &d)
		}
		if u := ratio(d.Moment.Abs().In(units.NewtonMetre), f.design.In(units.NewtonMetre)); u > worst {
			worst, w.Action, w.flexure = u, d, f
		}
	}
	return w
}

// strained keeps a strain that falls shorter of the least than what is held.
func (w *usage) strained(f *flexure, a *beam.Action) {
	if ratio(w.least.leastStrain, w.least.strain) < ratio(f.leastStrain, f.strain) {
		w.least, w.leastUnder = *f, *a
	}
}

// strain takes into account the strain with every bar pulling.
func (w *usage) strain(e *edition, t *beam.Trial, s beam.Sense, axial units.Force, a *beam.Action) {
	w.tried = true
	if f, ok := e.trialStrained(t, s, axial); ok {
		w.strained(&f, a)
	}
}

func (e *edition) judgeSense(dst []beam.Check, t *beam.Trial, s beam.Sense, greatest *beam.Action) []beam.Check {
	u := e.use(t, s, *greatest)
	a := &u.Action
	mu := a.Moment.Abs()
	strength := checkAt(bendingIDs[s].strength, "9.5.1.1", s, a)
	if !u.ok {
		strength.Compare(mu.Amount(), units.Moment{}.Amount())
		strength.Reason = "no bars lie at the tension face"
		if t.Steel(s.TensionFace()).Count > 0 {
			strength.Reason = "nothing balances the section under the axial force"
		}
		return append(dst, strength)
	}
	strength.Compare(mu.Amount(), u.design.Amount())
	strain := checkAt(bendingIDs[s].strain, "9.3.3.1", s, &u.leastUnder)
	strain.Compare(units.Plain(u.least.leastStrain), units.Plain(u.least.strain))
	if u.tried {
		e.trialUnder(t, s, under(&u)) // again, for the working
	}
	switch {
	case t.Ultimate.Equilibria > 1:
		strength.Reason = "with the displaced concrete deducted more than one depth of the neutral axis balances; the least was taken"
	case !u.axial.IsZero():
		strength.Reason = "under the axial force, which takes from the strength in bending"
	case !a.Axial.IsZero():
		strength.Reason = "without the axial force, which adds to the strength in bending"
	}
	if t.Record {
		w := e.flexureSteps(t, s, &u.flexure, mu)
		if a.Combination != "" {
			w.steps[0].Note = "under " + a.Combination
		}
		strength.Steps, strain.Steps = w.steps, e.strainSteps(t, s, &u.least).steps
	}
	dst = append(dst, strength, strain, e.judgeMinimum(t, s, greatest, u.pulled))
	if t.Record {
		dst = append(dst, e.judgeCrossCheck(t, s, a, &u.flexure))
	}
	return e.judgeCracks(dst, t, s, greatest)
}

// under is the factored axial force in the equilibrium that an action meets.
func under(u *usage) units.Force {
	if u.axial.IsZero() {
		return units.Force{}
	}
	return u.Axial
}

// judgeMinimum compares the steel of the tension face with 9.6.1: As,min, or
// 4/3 of the steel required by analysis where that is less. Under an axial
// tension the waiver is not used.
func (e *edition) judgeMinimum(t *beam.Trial, s beam.Sense, a *beam.Action, pulled bool) beam.Check {
	b, steel := &t.Brief, tensionSteel(t, s)
	provided, d := steel.area, steel.depth
	c := checkAt(bendingIDs[s].minimum, "9.6.1.2", s, a)
	m := e.minimumSteel(b.Concrete.Strength, faceYield(t, s), e.problemWidth(t.Problem, s), d)
	need := m.area
	var req requiredTension
	if !units.AtMost(need, e.areaIn(provided)) && !pulled {
		z := e.trialSizing(t, s)
		req = z.tension(e.momentIn(a.Moment.Abs()))
		if waived := e.minimum.waiver * req.area; req.ok && waived < need {
			need = waived
			c.Clause, c.Reason = "9.6.1.3", waiverReason
		}
	}
	c.Compare(e.areaOf(need).Amount(), provided.Amount())
	if t.Record {
		c.Steps = e.minimumSteps(t, s, &m, &req, a.Moment.Abs()).steps
	}
	return c
}

const waiverReason = "4/3 of the steel required by analysis governs over 9.6.1.2"

// judgeCrossCheck finds the strength again by fibres.
func (e *edition) judgeCrossCheck(t *beam.Trial, s beam.Sense, a *beam.Action, f *flexure) beam.Check {
	c := checkAt(bendingIDs[s].crossCheck, "22.2", s, a)
	bending := bendingOf(s, &t.Brief.Readings)
	bending.Axial = f.axial
	cross, err := crossCheck(e.trialSection(t, s), t.Law, bending, f.nominal)
	if err != nil {
		c.Compare(units.Plain(beam.NoCapacity), units.Plain(crossCheckTolerance))
		c.Reason = "the second route finds no equilibrium: " + err.Error()
		return c
	}
	c.Compare(units.Plain(cross.Difference), units.Plain(crossCheckTolerance))
	c.Reason = cross.Method
	return c
}

// judgeGrades holds bars of a yield strength of their own against the tables,
// whether or not a moment pulls on them; the brief's own was held against them
// before.
func (e *edition) judgeGrades(dst []beam.Check, t *beam.Trial) []beam.Check {
	for _, face := range [2]beam.Face{beam.Bottom, beam.Top} {
		rows := t.Steel(face).Rows
		for i := range rows {
			dst = e.judgeGrade(dst, t, face, rows[i].Yield)
		}
	}
	if t.Side.Each > 0 {
		dst = e.judgeGrade(dst, t, beam.Side, t.Side.Yield)
	}
	return dst
}

func (e *edition) judgeGrade(dst []beam.Check, t *beam.Trial, face beam.Face, yield units.Stress) []beam.Check {
	if yield == t.Brief.Reinforcement.Yield {
		return dst
	}
	c := beam.Check{ID: "flexure.grade", Clause: e.materials.yieldClause, Face: face}
	c.Compare(yield.Amount(), e.stressOf(e.materials.mostYield).Amount())
	if least := e.stressOf(e.materials.leastYield); !least.AtMost(yield) {
		c.Clause = "Table 20.2.1.3"
		c.Compare(least.Amount(), yield.Amount())
	}
	return append(dst, c)
}

// judgeCracks compares the widest spacing of the bars nearest the tension face,
// those in its flange among them, with 24.3.2, or the width of the face where
// there is a single bar (24.3.3). The stress at service loads is taken as 2/3 fy
// (24.3.2.1), of the strongest of the bars.
func (e *edition) judgeCracks(dst []beam.Check, t *beam.Trial, s beam.Sense, a *beam.Action) []beam.Check {
	face := s.TensionFace()
	steel := t.Steel(face)
	if len(steel.Fit.Layers) == 0 {
		return dst
	}
	cover := steel.Fit.Layers[0].Cover
	yield := greatestYield(t, face)
	limit := e.crackSpacing(e.crackStress(yield), cover)
	c := checkAt("crack.spacing", "24.3.2", s, a)
	c.Combination = "" // 24.3.2 goes by service loads, and here by 2/3 fy
	n := nearestTo(steel)
	given := n.widest(t, nil)
	if n.len() == 1 {
		c.ID, c.Clause, c.Reason = "crack.single-bar", "24.3.3", "one bar nearest the tension face: the width of the face may not exceed the spacing of 24.3.2"
		given = t.Geometry.FaceWidth(face)
	}
	c.Compare(given.Amount(), limit.Amount())
	if t.Record {
		var w working
		e.crackSteps(&w, yield, cover)
		c.Steps = w.steps
	}
	return e.judgeFlange(append(dst, c), t, s, a, limit)
}

// greatestYield is the greatest yield strength of the bars of the layer nearest
// a face.
func greatestYield(t *beam.Trial, face beam.Face) units.Stress {
	most := units.Stress{}
	for i := range t.Steel(face).Rows {
		if r := &t.Steel(face).Rows[i]; r.Layer == 1 {
			most = most.Max(r.Yield)
		}
	}
	if most.IsZero() {
		return t.Brief.Reinforcement.Yield
	}
	return most
}

// judgeTension judges demands whose axial tension pulls on the steel of both
// faces, for which neither sense of bending has a block of concrete: by statics
// each face takes its share, at its yield strength (22.4.3.1).
func (e *edition) judgeTension(dst []beam.Check, t *beam.Trial) []beam.Check {
	var pull facePulls
	var names [2]string
	low, high := t.Brief.Section.Depth, units.Length{} // of the steel, from the top; without bars, the faces
	if t.Bottom.Count > 0 {
		low = tensionSteel(t, beam.Positive).depth
	}
	if t.Top.Count > 0 {
		high = t.Brief.Section.Depth.Sub(tensionSteel(t, beam.Negative).depth)
	}
	for _, d := range t.Forces.Demands() {
		p := e.facePulls(t.Geometry.Parts, d.Axial, d.Moment, low, high)
		for i := range p.share {
			if p.pulled && (!pull.pulled || p.share[i] > pull.share[i]) {
				pull.share[i], names[i] = p.share[i], d.Combination
			}
		}
		pull.pulled = pull.pulled || p.pulled
	}
	if !pull.pulled {
		return dst
	}
	for i, sense := range [2]beam.Sense{beam.Positive, beam.Negative} {
		dst = append(dst, e.pullCheck(&pull, i, tensionArea(t, sense), faceYield(t, sense), names[i]))
	}
	return dst
}

// facePulls are the shares that the steel at the bottom and at the top take of an
// axial tension.
type facePulls struct {
	share  [2]float64
	pulled bool // there are shares; false: one face is pressed, and bending judges it
}

// facePulls shares an axial tension and a moment between steel at two depths from
// the top. A face takes nothing where the other takes all; where the force pulls
// beyond the steel of one face, the moment bends the section, which is judged as
// such if it is in that sense.
func (e *edition) facePulls(parts []mechanics.Part, axial units.Force, moment units.Moment, low, high units.Length) (p facePulls) {
	pull := -e.forceIn(axial)
	if pull <= 0 {
		return p
	}
	z := sizing{parts: parts, unit: e.length, height: e.lengthIn(parts[len(parts)-1].Bottom)}
	gross, first := z.concrete(z.height)
	top, apart, m := e.lengthIn(high), e.lengthIn(low.Sub(high)), e.momentIn(moment)
	p.share[0] = (pull*(first/gross-top) + m) / apart
	p.share[1] = pull - p.share[0]
	for i, s := range p.share {
		if units.AtMost(pull+s, pull) { // nothing, but for rounding
			p.share[i] = 0
		}
	}
	if p.share[0] == 0 && m < 0 || p.share[1] == 0 && m > 0 {
		return facePulls{}
	}
	p.pulled = true
	return p
}

// pullCheck holds the share of one face against its steel.
func (e *edition) pullCheck(p *facePulls, i int, area units.Area, yield units.Stress, name string) beam.Check {
	c := beam.Check{ID: "flexure.tension", Clause: "22.4.3.1", Face: [2]beam.Face{beam.Bottom, beam.Top}[i], Combination: name,
		Reason: "the axial tension pulls on the steel of both faces: this face's share, by statics"}
	c.Compare(e.forceOf(p.share[i]).Amount(), e.forceOf(e.reduction.tension*e.areaIn(area)*e.stressIn(yield)).Amount())
	return c
}
