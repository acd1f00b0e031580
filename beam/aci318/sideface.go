package aci318

import (
	"soffit.example/beam"
	"soffit.example/units"
)

// appendSideFace appends the checks on bars along the side faces (9.7.2.3). In
// a beam deeper than the limit they lie on both sides over half the depth from
// a face in tension, no further apart than 24.3.2 allows with the cover to the
// side face. The layers of that face are the first of the row, and the last
// may leave no more than a spacing to mid-depth.
func (e *edition) appendSideFace(dst []beam.Check, t *beam.Trial) []beam.Check {
	const clause = "9.7.2.3"
	depth := t.Brief.Section.Depth
	if units.AtMost(e.lengthIn(depth), e.crack.deep) {
		c := beam.NotApplicableCheck("side-face.spacing", clause, "the beam is no deeper than the limit beyond which side faces need bars")
		return append(dst, c)
	}
	if !uprightSides(t) {
		return append(dst, beam.NotJudgedCheck("side-face.spacing", clause,
			"the beam is deep enough to need bars along its sides, which are not those of the strip in which the stirrups stand: the cover to them changes with the level"))
	}
	cc := barCover(t)
	judged := false
	for _, sense := range [2]beam.Sense{beam.Positive, beam.Negative} {
		face := sense.TensionFace()
		steel := t.Steel(face)
		if !bendsAnywhere(t, sense) || steel.Count == 0 {
			continue
		}
		yield := greatestYield(t, face) // of the bars that may be stressed most
		if t.Side.Each > 0 {
			yield = yield.Max(t.Side.Yield)
		}
		most := e.crackSpacing(e.crackStress(yield), cc)
		c := beam.Check{ID: "side-face.spacing", Clause: clause, Face: face}
		c.Compare(sideGap(t, face).Amount(), most.Amount())
		if t.Side.Each == 0 && c.Outcome == beam.Fail {
			c.Reason = "there are no bars along the side faces"
		}
		if t.Record {
			var out working
			e.crackSteps(&out, yield, cc)
			out.given("s", "greatest distance left between bars along the side, over half the depth", clause,
				e.asLength(e.lengthIn(sideGap(t, face))))
			c.Steps = out.steps
		}
		dst = append(dst, c)
		judged = true
	}
	if !judged {
		dst = append(dst, beam.NotJudgedCheck("side-face.spacing", clause, "the beam is deep enough to need bars along its sides, and no moment says which face is in tension"))
	}
	return dst
}

// uprightSides reports whether the sides of the section are those of the strip in
// which the stirrups stand. A flange or a ledge beside a web does not change the
// web's sides.
func uprightSides(t *beam.Trial) bool {
	return t.Brief.Section.Shape != beam.Polygon || t.Geometry.Overall.AtMost(t.Brief.Section.Width)
}

// bendsAnywhere reports whether any action bends the beam in a sense.
func bendsAnywhere(t *beam.Trial, s beam.Sense) bool {
	for span := 1; span <= t.Forces.Spans(); span++ {
		if _, ok := t.Forces.Moment(s, span, units.Length{}, t.Brief.Spans[span-1]); ok {
			return true
		}
	}
	for i := range t.Forces.Demands() {
		if m := t.Forces.Demands()[i].Moment.In(units.NewtonMetre); s == beam.Positive && m > 0 || s == beam.Negative && m < 0 {
			return true
		}
	}
	return false
}

// sideGap is the greatest distance along the side between bars, from the
// layer nearest a face to mid-depth. Upper layers are bars along the side too, but for one of a
// single bar, which stands in the middle.
// Side bars are counted from the last layer of their own tension face,
// whichever face is asked for.
func sideGap(t *beam.Trial, face beam.Face) units.Length {
	depth := t.Brief.Section.Depth
	half := depth.Scale(0.5)
	s := &t.Side
	var worst units.Length
	layers := t.Steel(face).Fit.Layers
	for i, below := 1, 0; i < len(layers); i++ {
		if layers[i].Count > 1 {
			worst = worst.Max(layers[i].Centroid.Sub(layers[below].Centroid))
			below = i
		}
	}
	origin, before := t.Steel(s.TensionFace).Farthest, t.Steel(face).Farthest
	for i := 1; i <= s.Each && before.Less(half); i++ {
		at := origin.Add(s.Spacing.Scale(float64(i)))
		if face != s.TensionFace {
			at = depth.Sub(origin.Add(s.Spacing.Scale(float64(s.Each + 1 - i))))
		}
		worst = worst.Max(at.Sub(before))
		before = at
	}
	if before.Less(half) {
		worst = worst.Max(half.Sub(before))
	}
	return worst
}
