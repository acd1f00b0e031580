package aci318

import (
	"math"

	"soffit.example/beam"
	"soffit.example/units"
)

// torsionFaces gathers what the longitudinal steel of torsion asks of the bars
// at the bottom and at the top, beside what bending asks of them (9.5.4.3), and
// of the bars along the sides.
type torsionFaces struct {
	e        *edition
	t        *beam.Trial
	strength torsionStrength
	cage     torsionCage
	faces    [2]torsionFace // bottom and top: tension under positive and negative bending
	side     worstSide
}

// torsionFace is one face while it is judged, in the units of the edition.
type torsionFace struct {
	sense      beam.Sense // that puts it in tension
	sizing     sizing
	fy         float64 // of its bars as it may be used in torsion
	area, web  float64 // of all its bars, and of those inside the stirrups
	lever      float64 // d of the opposite bars, 9.5.4.5
	most       float64 // the greatest moment in tension, and the steel that it needs
	mostSteel  float64
	beyond     bool // no steel in tension carries that moment
	worst      faceNeed
	found      bool
	worstRatio float64
}

// faceNeed is what one stretch of the beam asks of a face.
type faceNeed struct {
	action   beam.Action
	moment   float64 // in the sense that puts the face in tension; negative: in compression
	axial    float64
	most     float64 // Tu, the greatest of the stretch
	low      float64 // and the least that is not neglected
	leg      float64 // At/s for most
	strength float64 // Al fy by 22.7.6.1
	least    float64 // Al,min fy
	share    float64 // area, of this face
	floor    float64 // area that 9.5.4.5 leaves
	bending  float64 // area
	pulled   float64 // area for axial tension at a face in compression
	relief   float64 // area
	inside   float64 // area that must lie inside the stirrups
	need     float64 // area in all
	broken   string
}

// worstSide is the greatest pull that torsion asks for along the beam.
type worstSide struct {
	found bool
	need  faceNeed
}

func (w *worstSide) take(n *faceNeed) {
	if !w.found || max(n.strength, n.least) > max(w.need.strength, w.need.least) {
		w.found, w.need = true, *n
	}
}

// newTorsionFaces readies both faces of a trial.
func (e *edition) newTorsionFaces(t *beam.Trial) torsionFaces {
	f := torsionFaces{e: e, t: t, strength: e.problemTorsion(t.Problem)}
	f.cage = e.trialCage(t, &f.strength, t.Stirrup.Diameter)
	for i := range f.faces {
		face := &f.faces[i]
		face.sense = beam.Sense(i + 1)
		steel := t.Steel(face.sense.TensionFace())
		face.area, face.web = e.areaIn(tensionArea(t, face.sense)), e.areaIn(steel.Fit.Area)
		face.fy = e.torsionYield(faceYield(t, face.sense))
		opposite := beam.Sense(2 - i)
		d := t.EffectiveDepth(opposite)
		if d.IsZero() { // bars not laid yet: d can be no greater than this
			d = t.Brief.Section.Depth.Sub(t.Cover).Sub(t.Stirrup.Diameter)
		}
		face.lever = e.lengthIn(d)
		if steel.Count == 0 {
			continue
		}
		face.sizing = e.trialSizing(t, face.sense)
		if m, bent := greatestMoment(t.Problem, face.sense); bent {
			face.most = e.momentIn(m)
			var ok bool
			if face.mostSteel, ok = face.sizing.steel(e, t, face.sense, face.most, 0); !ok {
				face.beyond = true
			}
		}
	}
	return f
}

// cuts is how many parts a stretch without a change of load is cut into. What
// is asked of a part is bounded by the greatest of its moments with the
// greatest and the least of its torques, as if they met.
const cuts = 32

// follow takes every part of every span, and every demand.
func (f *torsionFaces) follow() {
	forces := &f.t.Forces
	for span := 1; span <= forces.Spans(); span++ {
		if !forces.HasTorque(span) {
			continue
		}
		var room [48]units.Length
		breaks := forces.Breaks(room[:0], span)
		left, right := f.t.Faces(span)
		for i := range forces.Combinations() {
			at := left
			for _, b := range breaks {
				if at.Less(b) && b.Less(right) {
					f.stretch(i, span, at, b)
					at = b
				}
			}
			f.stretch(i, span, at, right)
		}
	}
	for i := range forces.Demands() {
		a := forces.Demands()[i]
		f.strength.load(f.e, a.Axial)
		q := f.strength.torque(f.e, &a)
		if !q.neglected {
			m := f.e.momentIn(a.Moment)
			f.part(&a, m, m, f.leastActing(&a, q.used), q.used)
		}
	}
}

// torqueEnds is the torque of a path at both ends of a stretch, between which
// it is linear.
type torqueEnds struct{ from, to float64 }

func (t torqueEnds) at(share float64) float64 { return t.from + share*(t.to-t.from) }

// between is the part from one share to another.
func (t torqueEnds) between(a, b float64) torqueEnds { return torqueEnds{t.at(a), t.at(b)} }

// span is the least and the greatest magnitude.
func (t torqueEnds) span() (least, most float64) {
	a, b := max(t.from, -t.from), max(t.to, -t.to)
	least, most = min(a, b), max(a, b)
	if t.from < 0 && t.to > 0 || t.from > 0 && t.to < 0 {
		least = 0
	}
	return least, most
}

// stretch takes a length on which no load begins or ends under combination i.
func (f *torsionFaces) stretch(i, span int, from, to units.Length) {
	e := f.e
	length := to.Sub(from).In(units.Metre)
	a, b := f.t.Forces.Action(i, span, from, true), f.t.Forces.Action(i, span, to, false)
	all := torqueEnds{e.momentIn(a.Torque), e.momentIn(b.Torque)}
	own := torqueEnds{e.momentIn(a.Torque.Sub(a.Compatible)), e.momentIn(b.Torque.Sub(b.Compatible))}
	if qa, qb := f.strength.torque(e, &a), f.strength.torque(e, &b); qa.neglected && qb.neglected {
		return
	}
	if !(length > 0) {
		m := e.momentIn(a.Moment)
		f.bounded(&a, m, m, all, own)
		return
	}
	s := newShearStretch(length, a.Moment.In(units.NewtonMetre), a.Shear.In(units.Newton), b.Moment.In(units.NewtonMetre), b.Shear.In(units.Newton))
	moment := func(t float64) float64 { return e.momentIn(units.NewtonMetre.Of(s.moment(t))) }
	turns, n := s.turns()
	before := 0.0
	m0 := e.momentIn(a.Moment)
	for k := 1; k <= cuts; k++ {
		t := length * float64(k) / cuts
		m1 := e.momentIn(b.Moment)
		if k < cuts {
			m1 = moment(t)
		}
		low, high := min(m0, m1), max(m0, m1)
		for _, turn := range turns[:n] {
			if before < turn && turn < t {
				m := moment(turn)
				low, high = min(low, m), max(high, m)
			}
		}
		at := a
		at.At = from.Add(units.Metre.Of(before))
		f.bounded(&at, low, high, all.between(before/length, t/length), own.between(before/length, t/length))
		before, m0 = t, m1
	}
}

// bounded takes a part with moments from low to high, and the torques of its
// ends.
func (f *torsionFaces) bounded(a *beam.Action, low, high float64, all, own torqueEnds) {
	allLeast, allMost := all.span()
	ownLeast, ownMost := own.span()
	if f.strength.neglects(max(allMost, ownMost)) {
		return
	}
	crack := f.strength.phi * f.strength.cracking
	most := max(ownMost, min(allMost, crack))
	// The least steel of 9.6.4.3 falls as the torque grows: it is taken for the
	// torque that acts, even where a part of it is designed for alone.
	designed := max(ownLeast, min(allLeast, crack))
	least := max(min(allLeast, designed), min(most, f.strength.phi*f.strength.threshold))
	f.part(a, low, high, least, most)
}

// leastActing is the torque by which the least steel of a demand goes.
func (f *torsionFaces) leastActing(a *beam.Action, used float64) float64 {
	acts := math.Abs(f.e.momentIn(a.Torque))
	return min(used, max(acts, f.strength.phi*f.strength.threshold))
}

// part asks both faces, and the sides, for the steel of moments from low to
// high with torques from least to most.
func (f *torsionFaces) part(a *beam.Action, low, high, least, most float64) {
	n := faceNeed{action: *a, most: most, low: least, axial: f.e.forceIn(a.Axial)}
	if f.cage.area == 0 {
		n.broken = noteNoCage
	} else {
		n.leg = f.cage.legFor(most)
		n.strength, _ = f.cage.pullFor(n.leg)
		n.least = f.cage.leastPull(f.cage.legFor(least))
	}
	f.side.take(&n)
	n.moment = high
	f.faces[0].take(f, n)
	n.moment = -low
	f.faces[1].take(f, n)
}

// take asks the face for what a part of the beam needs of it.
func (face *torsionFace) take(f *torsionFaces, n faceNeed) {
	e := f.e
	if n.broken != "" {
		face.found, face.worst, face.worstRatio = true, n, beam.NoCapacity
		return
	}
	of := f.cage.faceShare(e) / face.fy
	n.share, n.floor = of*max(n.strength, n.least), of*n.least
	n.inside = n.share
	switch {
	case n.moment <= 0:
		// In compression: the compression relieves it, down to the least steel.
		n.relief = -n.moment / (creditShare * face.lever * face.fy)
		if n.axial < 0 {
			n.pulled = -n.axial / (e.reduction.tension * face.fy)
		}
		n.inside = max(n.share-n.relief, n.floor)
		n.need = max(n.share+n.pulled-n.relief, n.floor)
	case face.area == 0:
		n.need = n.share // of bars that are not there
	case face.beyond:
		n.broken = noteBeyondBending
	default:
		// Required steel grows faster than the moment, so that a share of that
		// of the greatest moment bounds it.
		if bound := face.mostSteel*n.moment/face.most + n.share; n.axial == 0 && face.found &&
			max(ratio(bound, face.area), ratio(n.inside, face.web)) <= face.worstRatio {
			return
		}
		var ok bool
		if n.bending, ok = face.sizing.steel(e, f.t, face.sense, n.moment, n.axial); !ok {
			n.broken = noteBeyondBending
		}
		n.need = n.bending + n.share
	}
	u := max(ratio(n.need, face.area), ratio(n.inside, face.web))
	if n.broken != "" {
		u = beam.NoCapacity
	}
	if !face.found || u > face.worstRatio {
		face.found, face.worst, face.worstRatio = true, n, u
	}
}

const noteBeyondBending = "no amount of steel in tension carries the moment alone, so that none is left for the torque"

var torsionFaceIDs = [2]string{"torsion.longitudinal.bottom", "torsion.longitudinal.top"}

// judgeTorsionBars appends, for the bars of either face, whether they suffice
// for bending and torsion together, and stand close enough along the face.
func (e *edition) judgeTorsionBars(dst []beam.Check, t *beam.Trial) []beam.Check {
	if !t.Twisted {
		return dst
	}
	f := e.newTorsionFaces(t)
	f.follow()
	for i := range f.faces {
		dst = append(dst, f.check(i))
		steel := t.Steel(f.faces[i].sense.TensionFace())
		if len(steel.Fit.Layers) > 0 {
			dst = append(dst, e.aroundCheck(steel.Face, steel.Fit.Layers[0].Spacing))
		}
	}
	return dst
}

// aroundCheck compares a distance of neighbouring bars round the section with
// 9.7.5.1.
func (e *edition) aroundCheck(face beam.Face, gap units.Length) beam.Check {
	c := beam.Check{ID: "torsion.longitudinal-spacing", Clause: "9.7.5.1", Face: face}
	c.Compare(gap.Amount(), e.lengthOf(e.torsion.around).Amount())
	return c
}

// check is that of a face.
func (f *torsionFaces) check(i int) beam.Check {
	e, face := f.e, &f.faces[i]
	n := &face.worst
	c := beam.Check{ID: torsionFaceIDs[i], Clause: "9.5.4.3", Face: face.sense.TensionFace()}
	if !face.found {
		c.Outcome, c.Reason = beam.NotApplicable, noteNeglected
		return c
	}
	c.Span, c.At, c.HasAt, c.Combination = n.action.Span, n.action.At, n.action.Span > 0, n.action.Combination
	if n.broken != "" {
		refuse(&c, n.broken)
		return c
	}
	need, have := n.need, face.area
	if ratio(n.inside, face.web) > ratio(need, have) {
		need, have = n.inside, face.web
		c.Reason = "bars beside the web are outside the closed stirrups and do not count in torsion (9.7.5.1)"
	}
	c.Compare(e.areaOf(need).Amount(), e.areaOf(have).Amount())
	if face.web == 0 { // even where compression leaves nothing to ask for
		refuse(&c, "no bars lie at this face inside the stirrups")
	}
	if f.t.Record {
		c.Steps = f.faceSteps(face, need != n.need)
	}
	return c
}

// judgeCorners asks for a bar in each corner of the stirrups.
func judgeCorners(t *beam.Trial) beam.Check {
	c := beam.Check{ID: "torsion.corners", Clause: "9.7.5.1"}
	corners := min(2, outerBars(&t.Bottom)) + min(2, outerBars(&t.Top))
	c.Compare(units.Plain(4), units.Plain(float64(corners)))
	if c.Outcome == beam.Fail {
		c.Reason = "a longitudinal bar lies in each corner of the closed stirrups"
	}
	return c
}

// judgeWall asks that the stirrups stand clear of hollows by 9.7.6.3.4.
func (e *edition) judgeWall(t *beam.Trial) beam.Check {
	c := beam.Check{ID: "torsion.wall", Clause: "9.7.6.3.4"}
	s := e.problemTorsion(t.Problem)
	cage := e.trialCage(t, &s, t.Stirrup.Diameter)
	if cage.area == 0 {
		refuse(&c, noteNoCage)
		return c
	}
	c.Compare(e.lengthOf(cage.wallNeeded).Amount(), e.lengthOf(cage.wall).Amount())
	if t.Record {
		c.Steps = cage.wallSteps(e)
	}
	return c
}

// appendTorsionSides appends what torsion asks of the bars along the sides: as
// much as their share of the longitudinal steel, thick enough, and no wider
// apart round the section than 9.7.5.1 allows.
func (e *edition) appendTorsionSides(dst []beam.Check, t *beam.Trial) []beam.Check {
	if !t.Twisted {
		return dst
	}
	f := e.newTorsionFaces(t)
	f.follow()
	c := beam.Check{ID: "torsion.longitudinal.side", Clause: "9.5.4.3", Face: beam.Side}
	n := &f.side.need
	side := t.Side.Size.Area.Scale(float64(t.Side.Each))
	yield := t.Brief.Reinforcement.Yield
	if t.Side.Each > 0 {
		yield = t.Side.Yield
	}
	fy := e.torsionYield(yield)
	switch {
	case !f.side.found:
		c.Outcome, c.Reason = beam.NotApplicable, noteNeglected
	case n.broken != "":
		refuse(&c, n.broken)
	case f.cage.sideParts(e) == 1:
		c.Outcome, c.Reason = beam.NotApplicable, "the bars in the corners are close enough together to need none between them (9.7.5.1)"
	default:
		c.Span, c.At, c.HasAt, c.Combination = n.action.Span, n.action.At, n.action.Span > 0, n.action.Combination
		c.Compare(e.areaOf(f.cage.sideShare(e)*max(n.strength, n.least)/fy).Amount(), side.Amount())
		if t.Record {
			c.Steps = f.sideSteps(fy, e.areaIn(side))
		}
	}
	dst = append(dst, c)

	gap, found := widestAlongSide(t)
	c = e.aroundCheck(beam.Side, gap)
	if !found {
		refuse(&c, "no bars lie round the section")
	}
	dst = append(dst, c)

	if t.Side.Each > 0 {
		var widest units.Length
		for k := range t.Zones {
			widest = widest.Max(t.Zones[k].Spacing)
		}
		c = beam.Check{ID: "torsion.bar-diameter", Clause: "9.7.5.2", Face: beam.Side}
		c.Compare(e.leastTorsionBar(widest).Amount(), t.Side.Size.Diameter.Amount())
		dst = append(dst, c)
	}
	return dst
}

// widestAlongSide is the greatest distance between neighbouring bars along the
// sides, inside the stirrups: from layer to layer by their outer bars, and the
// side bars. found is false where a face has no bars.
func widestAlongSide(t *beam.Trial) (widest units.Length, found bool) {
	depth := t.Brief.Section.Depth
	for _, f := range [2]*beam.FaceSteel{&t.Bottom, &t.Top} {
		if len(f.Fit.Layers) == 0 {
			return units.Length{}, false
		}
		first := &f.Fit.Layers[0]
		below := first.Centroid
		for i := 1; i < len(f.Fit.Layers); i++ {
			if l := &f.Fit.Layers[i]; l.Count > 1 {
				widest = widest.Max(l.Centroid.Sub(below))
				below = l.Centroid
			}
		}
	}
	s := &t.Side
	near, far := t.Steel(s.TensionFace), t.Steel(s.TensionFace.Opposite())
	before := near.Farthest
	for i := 1; i <= s.Each; i++ {
		at := near.Farthest.Add(s.Spacing.Scale(float64(i)))
		widest = widest.Max(at.Sub(before))
		before = at
	}
	return widest.Max(depth.Sub(far.Farthest).Sub(before)), true
}
