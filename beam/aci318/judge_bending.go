package aci318

import (
	"soffit.example/beam"
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
	return dst
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

func (e *edition) judgeSense(dst []beam.Check, t *beam.Trial, s beam.Sense, a *beam.Action) []beam.Check {
	mu := a.Moment.Abs()
	strength := checkAt(bendingIDs[s].strength, "9.5.1.1", s, a)
	f, ok := e.trialFlexure(t, s)
	if !ok {
		strength.Compare(mu.Amount(), units.Moment{}.Amount())
		strength.Reason = "no bars lie at the tension face"
		return append(dst, strength)
	}
	strength.Compare(mu.Amount(), f.design.Amount())
	if t.Ultimate.Equilibria > 1 {
		strength.Reason = "with the displaced concrete deducted more than one depth of the neutral axis balances; the least was taken"
	}
	strain := checkAt(bendingIDs[s].strain, "9.3.3.1", s, a)
	strain.Compare(units.Plain(f.leastStrain), units.Plain(f.strain))
	if t.Record {
		w := e.flexureSteps(t, s, &f, mu)
		if a.Combination != "" {
			w.steps[0].Note = "under " + a.Combination
		}
		strength.Steps, strain.Steps = w.steps, e.strainSteps(t, &f).steps
	}
	dst = append(dst, strength, strain, e.judgeMinimum(t, s, a))
	if t.Record {
		dst = append(dst, e.judgeCrossCheck(t, s, a, f.nominal))
	}
	return e.judgeCracks(dst, t, s, a)
}

// judgeMinimum compares the steel of the tension face with 9.6.1: As,min, or
// 4/3 of the steel required by analysis where that is less.
func (e *edition) judgeMinimum(t *beam.Trial, s beam.Sense, a *beam.Action) beam.Check {
	b, steel := &t.Brief, t.Steel(s.TensionFace())
	d := t.EffectiveDepth(s)
	c := checkAt(bendingIDs[s].minimum, "9.6.1.2", s, a)
	m := e.minimumSteel(b.Concrete.Strength, faceYield(t, s), e.problemWidth(t.Problem, s), d)
	need := m.area
	var req requiredTension
	if !units.AtMost(need, e.areaIn(steel.Area)) {
		z := e.trialSizing(t, s)
		req = z.tension(e.momentIn(a.Moment.Abs()))
		if waived := e.minimum.waiver * req.area; req.ok && waived < need {
			need = waived
			c.Clause, c.Reason = "9.6.1.3", waiverReason
		}
	}
	c.Compare(e.areaOf(need).Amount(), steel.Area.Amount())
	if t.Record {
		c.Steps = e.minimumSteps(t, s, &m, &req, a.Moment.Abs()).steps
	}
	return c
}

const waiverReason = "4/3 of the steel required by analysis governs over 9.6.1.2"

// judgeCrossCheck finds the strength again by fibres.
func (e *edition) judgeCrossCheck(t *beam.Trial, s beam.Sense, a *beam.Action, nominal units.Moment) beam.Check {
	c := checkAt(bendingIDs[s].crossCheck, "22.2", s, a)
	cross, err := crossCheck(e.trialSection(t, s), t.Law, bendingOf(s, &t.Brief.Readings), nominal)
	if err != nil {
		c.Compare(units.Plain(beam.NoCapacity), units.Plain(crossCheckTolerance))
		c.Reason = "the second route finds no equilibrium: " + err.Error()
		return c
	}
	c.Compare(units.Plain(cross.Difference), units.Plain(crossCheckTolerance))
	c.Reason = cross.Method
	return c
}

// judgeCracks compares the widest spacing of the bars nearest the tension face
// with 24.3.2, or the width of the face where there is a single bar (24.3.3).
// The stress at service loads is taken as 2/3 fy (24.3.2.1).
func (e *edition) judgeCracks(dst []beam.Check, t *beam.Trial, s beam.Sense, a *beam.Action) []beam.Check {
	face := s.TensionFace()
	steel := t.Steel(face)
	if len(steel.Fit.Layers) == 0 {
		return dst
	}
	nearest := &steel.Fit.Layers[0]
	yield := t.Brief.Reinforcement.Yield
	limit := e.crackSpacing(e.crackStress(yield), nearest.Cover)
	c := checkAt("crack.spacing", "24.3.2", s, a)
	c.Combination = "" // 24.3.2 goes by service loads, and here by 2/3 fy
	given := nearest.Spacing
	if nearest.Count == 1 {
		c.ID, c.Clause, c.Reason = "crack.single-bar", "24.3.3", "one bar nearest the tension face: the width of the face may not exceed the spacing of 24.3.2"
		given = t.Brief.Section.Width
	}
	c.Compare(given.Amount(), limit.Amount())
	if t.Record {
		var w working
		e.crackSteps(&w, yield, nearest.Cover)
		c.Steps = w.steps
	}
	return append(dst, c)
}
