package aci318

import (
	"math"

	"soffit.example/beam"
	"soffit.example/units"
)

// torsionRules are the coefficients of torsion (22.7, 9.6.4, 9.7.5, 9.7.6.3),
// in the units of an edition.
type torsionRules struct {
	threshold float64 // of λ√f'c Acp²/pcp, 22.7.4.1
	cracking  float64 // 22.7.5.1
	axial     float64 // 1 + Nu/(4 Ag λ√f'c) under the root of both

	along        float64 // greatest spacing of stirrups, 9.7.6.3.3
	around       float64 // greatest spacing of bars round the section, 9.7.5.1
	bar          float64 // least diameter of those, 9.7.5.2
	longitudinal float64 // of √f'c Acp/fy, 9.6.4.3
	floor        float64 // of bw/fyt, what At/s is not taken below in 9.6.4.3
}

var (
	torsionUS = torsionRules{
		threshold: 1, cracking: 4, axial: 4,
		along: 12, around: 12, bar: 0.375, longitudinal: 5, floor: 25,
	}
	torsionSI = torsionRules{
		threshold: 0.083, cracking: 0.33, axial: 0.33,
		along: 300, around: 300, bar: 10, longitudinal: 0.42, floor: 0.175,
	}
)

const (
	hollowShare  = 0.95  // Ag/Acp below which 22.7.4.1 sees a hollow section, R22.7
	flangeDepths = 4     // of the flange's thickness: an overhang that counts, 9.2.4.4
	flowShare    = 0.85  // Ao/Aoh, 22.7.6.1.1
	sectionShare = 1.7   // of Aoh² or Aoh t, 22.7.7.1
	perimeters   = 8     // ph over the greatest spacing of stirrups, 9.7.6.3.3
	barShare     = 0.042 // of the spacing of stirrups: least bar diameter, 9.7.5.2
	wallShare    = 0.5   // of Aoh/ph: from the stirrup to a hollow, 9.7.6.3.4
	creditShare  = 0.9   // of d: lever of flexural compression, 9.5.4.5

	usualDiagonal                      = 45.0 // degrees, 22.7.6.1.2
	flattestDiagonal, steepestDiagonal = 30.0, 60.0
)

// torsionShape is the outline that 22.7 takes of a section, in the units of the
// edition.
type torsionShape struct {
	width, depth        float64 // of the web, or of the strip in which stirrups stand
	left, right, flange float64 // overhangs as far as they count by 9.2.4.4, and their thickness
	outline             bool    // of a polygon: its outline counts, not the strip alone,
	cut                 bool    // without what of its flanges goes beyond 9.2.4.4
	counted             bool    // flanges, or a polygon beyond its strip, are part of the areas
	hollow              bool    // of that outline
	walls               bool    // hollow in its strip alone, or as a whole
	enclosed            float64 // Acp
	perimeter           float64 // pcp
	gross               float64 // Ag of that outline: Acp less the hollows
}

// basis is what stands squared over pcp in 22.7.4.1.
func (s *torsionShape) basis() float64 {
	if s.hollow {
		return s.gross
	}
	return s.enclosed
}

func (s *torsionShape) close(enclosed, perimeter, hollows float64) {
	s.enclosed, s.perimeter, s.gross = enclosed, perimeter, max(0, enclosed-hollows)
	s.hollow = s.gross < hollowShare*enclosed
}

// torsionShape takes the outline with the flanges of 9.2.4.4, or without them
// where they would lessen Acp²/pcp (of a hollow section Ag²/pcp). What a
// polygon has beside its strip is taken likewise.
func (e *edition) torsionShape(s *beam.Section, g *beam.Geometry) torsionShape {
	web := torsionShape{width: e.lengthIn(s.Width), depth: e.lengthIn(s.Depth)}
	hollows := max(0, e.areaIn(g.Enclosed.Sub(g.Gross)))
	with := web
	web.close(web.width*web.depth, 2*(web.width+web.depth), hollows)
	switch {
	case s.Shape == beam.Polygon:
		with.outline = true
		left, right, cut := outlineOverhangs(s, g)
		area, perimeter := g.Enclosed, g.Perimeter
		if with.cut = cut; cut {
			area, perimeter = s.Clipped(g, left, right)
		}
		with.close(e.areaIn(area), e.lengthIn(perimeter), hollows)
	case s.Flange() != 0:
		left, right := torsionOverhangs(s)
		with.left, with.right, with.flange = e.lengthIn(left), e.lengthIn(right), e.lengthIn(s.FlangeThickness)
		over := with.left + with.right
		with.close(web.enclosed+over*with.flange, web.perimeter+2*over, hollows)
	default:
		web.walls = web.hollow
		return web
	}
	web.walls = web.hollow || with.hollow
	with.walls, with.counted = web.walls, with.enclosed > web.enclosed
	if !with.counted || with.basis()*with.basis()/with.perimeter < web.basis()*web.basis()/web.perimeter {
		web.left, web.right, web.flange = with.left, with.right, with.flange
		return web
	}
	return with
}

// torsionOverhangs are the flange's overhangs as 9.2.4.4 counts them: no more
// than the projection of the web beyond the slab, and than four times the
// flange's thickness. Of a floor slab half the clear distance to the next web
// is there, whatever of it works in bending.
func torsionOverhangs(s *beam.Section) (left, right units.Length) {
	left, right = s.Overhangs(s.Flange())
	if !s.Slab.IsZero() {
		left, right = s.Slab.ClearLeft.Scale(0.5), s.Slab.ClearRight.Scale(0.5)
	}
	most := s.Depth.Sub(s.FlangeThickness).Min(s.FlangeThickness.Scale(flangeDepths))
	return left.Min(most), right.Min(most)
}

// outlineOverhangs are the overhangs of a polygon beside its strip as far as they
// count, and whether anything is cut off them. One that is thinner than half the
// depth where it joins the strip is a flange, of which 9.2.4.4 counts no more
// than of a tee's; a thicker one is a part of the web. That half is a judgement.
func outlineOverhangs(s *beam.Section, g *beam.Geometry) (left, right units.Length, cut bool) {
	over := [2]units.Length{g.WebLeft, g.Overall.Sub(g.WebLeft).Sub(s.Width)}
	for i, t := range g.OverhangThickness {
		if !t.Less(s.Depth.Scale(0.5)) {
			continue
		}
		if most := s.Depth.Sub(t).Min(t.Scale(flangeDepths)); !over[i].AtMost(most) {
			over[i], cut = most, true
		}
	}
	return over[0], over[1], cut
}

// torsionStrength is what 22.7 knows of a section before stirrups are looked
// at, in the units of the edition.
type torsionStrength struct {
	torsionShape
	area           float64 // Ag of the whole section, flanges that 9.2.4.4 leaves out included
	strength, root float64 // f'c, and √f'c as it is capped without exception, 22.7.2.1
	rootCapped     bool
	light          lightness
	axial          float64 // Nu
	axialFactor    float64
	threshold      float64 // Tth
	cracking       float64 // Tcr
	phi            float64
}

// torsionStrength evaluates a section under an axial force, compression
// positive.
func (e *edition) torsionStrength(s *beam.Section, g *beam.Geometry, c *beam.Concrete, axial units.Force) torsionStrength {
	t := torsionStrength{
		torsionShape: e.torsionShape(s, g), area: e.areaIn(g.Gross),
		strength: e.stressIn(c.Strength), root: e.sqrtStrength(c.Strength), light: e.lightness(c), phi: e.reduction.torsion,
	}
	if t.root > e.materials.rootCap {
		t.root, t.rootCapped = e.materials.rootCap, true
	}
	t.load(e, axial)
	return t
}

// load puts the section under an axial force.
func (t *torsionStrength) load(e *edition, axial units.Force) {
	r := &e.torsion
	t.axial, t.axialFactor = e.forceIn(axial), 1
	if t.axial != 0 {
		t.axialFactor = math.Sqrt(max(0, 1+t.axial/(r.axial*t.area*t.light.factor*t.root)))
	}
	unit := t.light.factor * t.root / t.perimeter * t.axialFactor
	t.threshold = r.threshold * unit * t.basis() * t.basis()
	t.cracking = r.cracking * unit * t.enclosed * t.enclosed
}

// problemTorsion is the torsionStrength of a problem's section without an axial
// force.
func (e *edition) problemTorsion(p *beam.Problem) torsionStrength {
	return e.torsionStrength(&p.Brief.Section, &p.Geometry, &p.Brief.Concrete, units.Force{})
}

// sectionTorque is the torque at a section, in the unit of the edition and
// without sign.
type sectionTorque struct {
	acting      float64 // as analysed
	equilibrium float64 // the part that nothing else can carry
	used        float64 // Tu, what the section is designed for
	shed        float64 // what the neighbours must take instead
	neglected   bool    // below φTth
	distant     bool    // of a section within bt + d of the one that is judged
}

// torque is what the torque of an action asks of the section. The part that
// compatibility imposes may be shed down to φTcr in all, and never enough to
// cut into the part that equilibrium needs (22.7.3). Where the two oppose each
// other the equilibrium part counts alone too, as the other may never come.
func (t *torsionStrength) torque(e *edition, a *beam.Action) sectionTorque {
	q := sectionTorque{
		acting:      math.Abs(e.momentIn(a.Torque)),
		equilibrium: math.Abs(e.momentIn(a.Torque.Sub(a.Compatible))),
	}
	q.used = max(q.equilibrium, min(q.acting, t.phi*t.cracking))
	q.shed = max(0, q.acting-q.used)
	q.neglected = t.neglects(q.most())
	return q
}

// most is the torque that is held against the threshold.
func (q *sectionTorque) most() float64 { return max(q.acting, q.equilibrium) }

// neglects reports whether a torque may be neglected: it must be less than
// φTth, not equal to it (9.5.4.1).
func (t *torsionStrength) neglects(torque float64) bool {
	return torque == 0 || !units.AtMost(t.phi*t.threshold, torque)
}

// worstTorque is the action whose torque comes nearest its threshold; ok is
// false where no torque acts.
func (e *edition) worstTorque(p *beam.Problem) (worst beam.Action, strength torsionStrength, ok bool) {
	t := e.problemTorsion(p)
	most := 0.0
	take := func(a beam.Action) {
		q := t.torque(e, &a)
		if q.most() == 0 {
			return
		}
		if u := ratio(q.most(), t.phi*t.threshold); !ok || u > most {
			worst, strength, most, ok = a, t, u, true
		}
	}
	for span := 1; span <= p.Forces.Spans(); span++ {
		from, to := p.Faces(span)
		eachTorque(&p.Forces, span, from, to, take)
	}
	for i := range p.Forces.Demands() {
		a := p.Forces.Demands()[i]
		t.load(e, a.Axial)
		take(a)
	}
	return worst, strength, ok
}

// eachTorque visits the places between two of a span where a torque may be
// greatest: between them the torque of each path is linear.
func eachTorque(f *beam.Forces, span int, from, to units.Length, visit func(a beam.Action)) {
	for i := range f.Combinations() {
		combinationTorque(f, i, span, from, to, visit)
	}
}

// combinationTorque is eachTorque of one combination, from left to right.
func combinationTorque(f *beam.Forces, i, span int, from, to units.Length, visit func(a beam.Action)) {
	if !f.HasTorque(span) {
		return
	}
	var room [48]units.Length
	visit(f.Action(i, span, from, true))
	for _, x := range f.Breaks(room[:0], span) {
		if from.Less(x) && x.Less(to) {
			visit(f.Action(i, span, x, false))
			visit(f.Action(i, span, x, true))
		}
	}
	visit(f.Action(i, span, to, false))
}

// twists reports whether some torque of a problem may not be neglected.
func (e *edition) twists(p *beam.Problem) bool {
	a, t, ok := e.worstTorque(p)
	if !ok {
		return false
	}
	q := t.torque(e, &a)
	return !q.neglected
}

// What is said of the torque as a whole.
const (
	noteNoTorque    = "no torque acts"
	noteNeglected   = "every torque is below φTth and is neglected (9.5.4.1)"
	noteDesignedFor = "the torque is not below φTth: the beam is designed for it by 22.7"
)

// judgeTorsion appends whether torsion may be neglected, and what does not go
// by zones of stirrups: a bar in each corner, and the walls of a hollow
// section.
func (e *edition) judgeTorsion(dst []beam.Check, t *beam.Trial) []beam.Check {
	c := beam.Check{ID: "torsion.threshold", Clause: "9.5.4.1"}
	if !torqueActs(&t.Forces) {
		c.Outcome, c.Reason = beam.NotApplicable, noteNoTorque
		return append(dst, c)
	}
	a, s, ok := e.worstTorque(t.Problem)
	if !ok {
		c.Outcome, c.Reason = beam.NotApplicable, noteNoTorque
		return append(dst, c)
	}
	q := s.torque(e, &a)
	c.Span, c.At, c.HasAt, c.Combination = a.Span, a.At, a.Span > 0, a.Combination
	c.Compare(e.momentOf(q.most()).Amount(), e.momentOf(s.phi*s.threshold).Amount())
	c.Reason = noteNeglected
	if !q.neglected {
		c.Outcome, c.Reason = beam.NotApplicable, noteDesignedFor
	}
	if t.Record {
		c.Steps = s.thresholdSteps(e)
	}
	dst = append(dst, c)
	if !t.Twisted {
		return append(dst,
			beam.NotApplicableCheck("torsion.section", "22.7.7.1", noteNeglected),
			beam.NotApplicableCheck("torsion.transverse", "9.5.4.3", noteNeglected))
	}
	dst = append(dst, judgeCorners(t))
	if t.Geometry.Hollow {
		dst = append(dst, e.judgeWall(t))
	}
	return dst
}

// torqueActs reports whether any torque acts.
func torqueActs(f *beam.Forces) bool {
	for span := 1; span <= f.Spans(); span++ {
		if f.HasTorque(span) {
			return true
		}
	}
	for i := range f.Demands() {
		if !f.Demands()[i].Torque.IsZero() {
			return true
		}
	}
	return false
}
