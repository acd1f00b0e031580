package aci318

import (
	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/units"
)

// Tension steel in a flange (24.3.4): a part of it lies beside the web, spread
// over the lesser of the effective width and ℓn/10, centred on the web; what of
// the flange lies farther out has steel of the level of 24.4.3.

// flangeSide is the flange on one side of the web at a face in tension.
type flangeSide struct {
	over  units.Length // overhang
	to    units.Length // from the web, where the spread ends
	reach units.Length // from the web to the outermost place of a bar within the spread
	needs bool         // there is room for a bar beside the web
}

// flangeSides are the sides of the flange at a face. A bar keeps the cover of
// the stirrups to the end of the flange.
func flangeSides(t *beam.Trial, face beam.Face) (sides [2]flangeSide, any bool) {
	left, right := t.Brief.Section.Overhangs(face)
	beyond := flangeSpread(t.Problem, face).Sub(t.Brief.Section.Width).Scale(0.5)
	radius := t.Steel(face).Largest.Diameter.Scale(0.5)
	for i, over := range [2]units.Length{left, right} {
		s := flangeSide{over: over, to: beyond.Min(over)}
		s.reach = beyond.Min(over.Sub(t.Cover).Sub(radius))
		s.needs = !over.IsZero() && radius.Less(s.reach)
		sides[i] = s
		any = any || s.needs
	}
	return sides, any
}

// counts reports whether a flange bar lies where 24.3.4 puts tension steel.
func (s *flangeSide) counts(out units.Length) bool { return out.AtMost(s.to) }

// tensionArea is the steel of the tension face that counts in bending.
func tensionArea(t *beam.Trial, s beam.Sense) units.Area {
	return tensionSteel(t, s).area
}

// faceSteel is the steel of a tension face that counts in bending and in shear:
// all of it but the bars beyond the spread of 24.3.4.
type faceSteel struct {
	area           units.Area
	depth, extreme units.Length // d, to the centroid, and dt, to the bars nearest the face
}

// tensionSteel finds the steel of the tension face that counts. Where none does,
// depth and extreme are those of the bars that there are.
func tensionSteel(t *beam.Trial, s beam.Sense) faceSteel {
	f := t.Steel(s.TensionFace())
	all := faceSteel{area: f.Area, depth: t.EffectiveDepth(s), extreme: t.ExtremeDepth(s)}
	if !beyondSpread(t, s) {
		return all
	}
	sides, _ := flangeSides(t, s.TensionFace())
	var area units.Area
	first, nearest := 0.0, units.Length{}
	count := func(size *bars.Size, y units.Length) {
		if area.IsZero() || y.Less(nearest) {
			nearest = y
		}
		area = area.Add(size.Area)
		first += size.Area.In(units.SquareMetre) * y.In(units.Metre)
	}
	for i := range f.Fit.Bars {
		count(&f.Fit.Bars[i].Size, f.Fit.Bars[i].Y)
	}
	for i := range f.Flange {
		if side, out := t.Beside(&f.Flange[i]); sides[side].counts(out) {
			count(&f.Flange[i].Size, f.Flange[i].Y)
		}
	}
	if area.IsZero() {
		return faceSteel{depth: all.depth, extreme: all.extreme}
	}
	h := t.Brief.Section.Depth
	return faceSteel{area: area, depth: h.Sub(units.Metre.Of(first / area.In(units.SquareMetre))), extreme: h.Sub(nearest)}
}

// beyondSpread reports whether bars of the tension face lie farther out in the
// flange than 24.3.4 spreads the tension steel.
func beyondSpread(t *beam.Trial, s beam.Sense) bool {
	face := s.TensionFace()
	f := t.Steel(face)
	if len(f.Flange) == 0 {
		return false
	}
	sides, _ := flangeSides(t, face)
	for i := range f.Flange {
		if side, out := t.Beside(&f.Flange[i]); !sides[side].counts(out) {
			return true
		}
	}
	return false
}

// nearestBars are the bars nearest a face, from left to right: those beside the
// web on its left, the first layer, and those on its right.
type nearestBars struct {
	flange []beam.FlangeBar
	web    []bars.Placed
	left   int // how many of flange come first
}

func nearestTo(f *beam.FaceSteel) (n nearestBars) {
	if len(f.Fit.Layers) == 0 {
		return n
	}
	l := &f.Fit.Layers[0]
	n.web, n.flange = f.Fit.Bars[l.First:l.First+l.Count], f.Flange
	for n.left < len(n.flange) && n.flange[n.left].X.Less(n.web[0].X) {
		n.left++
	}
	return n
}

func (n *nearestBars) len() int { return len(n.web) + len(n.flange) }

// at is the i-th bar: the size, the centre, and whether it lies beside the web.
func (n *nearestBars) at(i int) (size *bars.Size, x, y units.Length, besideWeb bool) {
	switch k := i - n.left; {
	case k < 0:
		b := &n.flange[i]
		return &b.Size, b.X, b.Y, true
	case k < len(n.web):
		b := &n.web[k]
		return &b.Size, b.X, b.Y, false
	default:
		b := &n.flange[i-len(n.web)]
		return &b.Size, b.X, b.Y, true
	}
}

// widest is the greatest distance between the centres of neighbours; with sides,
// of those within the spread, and to its edges where a bar belongs there.
func (n *nearestBars) widest(t *beam.Trial, sides *[2]flangeSide) (most units.Length) {
	width := t.Brief.Section.Width
	var last units.Length
	seen := false
	for i := range n.len() {
		_, x, _, besideWeb := n.at(i)
		if besideWeb && sides != nil {
			side, out := 0, x.Neg()
			if i >= n.left {
				side, out = 1, x.Sub(width)
			}
			if !sides[side].counts(out) {
				continue
			}
		}
		switch {
		case seen:
			most = most.Max(x.Sub(last))
		case sides != nil && sides[0].needs:
			most = x.Add(sides[0].reach)
		}
		last, seen = x, true
	}
	if sides != nil && sides[1].needs {
		most = most.Max(width.Add(sides[1].reach).Sub(last))
	}
	return most
}

// judgeFlange appends what 24.3.4 asks of a flange in tension.
func (e *edition) judgeFlange(dst []beam.Check, t *beam.Trial, s beam.Sense, a *beam.Action, limit units.Length) []beam.Check {
	const clause = "24.3.4"
	face := s.TensionFace()
	if left, right := t.Brief.Section.Overhangs(face); left.IsZero() && right.IsZero() {
		return dst
	}
	sides, any := flangeSides(t, face)
	steel := t.Steel(face)
	spread := checkAt("crack.flange-spread", clause, s, a)
	spread.Combination = ""
	if !any {
		spread.Outcome, spread.Reason = beam.NotApplicable, "the width over which tension steel is spread leaves no room for a bar beside the web"
		dst = append(dst, spread)
	} else {
		var has [2]bool
		for i := range steel.Flange {
			side, out := t.Beside(&steel.Flange[i])
			has[side] = has[side] || sides[side].counts(out)
		}
		asked, found := 0, 0
		for i := range sides {
			if sides[i].needs {
				asked++
				if has[i] {
					found++
				}
			}
		}
		spread.Compare(units.Plain(float64(asked)), units.Plain(float64(found)))
		spread.Reason = "sides of the web with tension steel beside it, within the lesser of the effective width and ℓn/10: required and provided"
		dst = append(dst, spread)

		spacing := checkAt("crack.flange-spacing", "24.3.4, 24.3.2", s, a)
		spacing.Combination = ""
		n := nearestTo(steel)
		spacing.Compare(n.widest(t, &sides).Amount(), limit.Amount())
		if t.Record {
			spacing.Steps = e.spreadSteps(t, s, limit, n.widest(t, &sides)).steps
		}
		dst = append(dst, spacing)
	}
	return e.judgeOuter(dst, t, s, a, &sides)
}

// judgeOuter judges the flange beyond ℓn/10: steel of 24.4.3 along its outer
// parts.
func (e *edition) judgeOuter(dst []beam.Check, t *beam.Trial, s beam.Sense, a *beam.Action, sides *[2]flangeSide) []beam.Check {
	c := checkAt("crack.flange-outer", "24.3.4, 24.4.3", s, a)
	c.Combination = ""
	face := s.TensionFace()
	if t.Forces.Spans() == 0 {
		c.Outcome, c.Reason = beam.NotJudged, "demands have no clear span: whether the flange is wider than ℓn/10 is not known"
		return append(dst, c)
	}
	if t.Geometry.FaceWidth(face).AtMost(flangeSpread(t.Problem, face)) {
		return dst
	}
	var areas [2]units.Area
	steel := t.Steel(face)
	found := false
	for i := range steel.Flange {
		if side, out := t.Beside(&steel.Flange[i]); !sides[side].counts(out) {
			areas[side] = areas[side].Add(steel.Flange[i].Size.Area)
			found = true
		}
	}
	if !found {
		c.Outcome, c.Reason = beam.NotJudged, "the flange is wider than ℓn/10, and no bars are given in its outer parts: the slab's own steel there is not part of the input"
		return append(dst, c)
	}
	worst := -1.0
	for i := range sides {
		if !sides[i].to.Less(sides[i].over) {
			continue
		}
		o := outerSteel{width: sides[i].over.Sub(sides[i].to), area: areas[i]}
		need := e.outerNeed(t, &o)
		if u := ratio(need.In(units.SquareMetre), o.area.In(units.SquareMetre)); u > worst {
			worst = u
			c.Compare(need.Amount(), o.area.Amount())
			if t.Record {
				c.Steps = e.outerSteps(t, &o).steps
			}
		}
	}
	return append(dst, c)
}

// outerSteel is one outer part of a flange and the bars in it.
type outerSteel struct {
	width units.Length
	area  units.Area
}

func (e *edition) outerNeed(t *beam.Trial, o *outerSteel) units.Area {
	return o.width.MulLength(t.Brief.Section.FlangeThickness).Scale(e.shrinkageRatio(t.Brief.Reinforcement.Yield))
}

// shrinkageRatio is the least ratio of steel against shrinkage and temperature
// (24.4.3.2).
func (e *edition) shrinkageRatio(yield units.Stress) float64 {
	r, fy := &e.crack, e.stressIn(yield)
	switch {
	case !r.shrinkageByYield:
		return r.shrinkage
	case fy < e.materials.grade60 && !units.AtMost(e.materials.grade60, fy):
		return r.shrinkageWeak
	}
	return max(r.shrinkage*e.materials.grade60/fy, r.shrinkageLeast)
}

// spreadSteps is the working of the spacing over a flange.
func (e *edition) spreadSteps(t *beam.Trial, s beam.Sense, limit, given units.Length) *working {
	w := new(working)
	face := s.TensionFace()
	w.given("be", "effective width of the flange", "6.3.2", e.asLength(e.lengthIn(t.Geometry.FaceWidth(face))))
	if t.Forces.Spans() == 0 {
		w.note("the clear span is not known, and ℓn/10 is left out")
	} else {
		shortest, _ := shortestClearSpan(&t.Brief)
		w.given("ℓn", "shortest clear span", "", e.asLength(e.lengthIn(shortest)))
		w.find("bs", "width over which the tension steel is spread", "24.3.4", "min(be, ℓn / 10)", e.asLength(e.lengthIn(flangeSpread(t.Problem, face))))
	}
	w.given("s,max", "greatest spacing between centres", "24.3.2", e.asLength(e.lengthIn(limit)))
	w.note("see the spacing of the bars in the web")
	w.given("s", "greatest distance left between bars, and from the last one to the edge of that width", "", e.asLength(e.lengthIn(given)))
	return w
}

// outerSteps is the working of the steel in one outer part of a flange.
func (e *edition) outerSteps(t *beam.Trial, o *outerSteel) *working {
	w := new(working)
	r := &e.crack
	w.given("hf", "thickness of the flange", "", e.asLength(e.lengthIn(t.Brief.Section.FlangeThickness)))
	w.given("bo", "width of the flange beyond the spread", "24.3.4", e.asLength(e.lengthIn(o.width)))
	yield := t.Brief.Reinforcement.Yield
	switch k := e.shrinkageRatio(yield); {
	case r.shrinkageByYield && k != r.shrinkageWeak:
		w.given("fy", "yield strength of the bars", "", e.asStress(e.stressIn(yield)))
		w.find("ρ", "least ratio of steel", "Table 24.4.3.2", "max("+number(r.shrinkage)+" "+number(e.materials.grade60)+" / fy, "+number(r.shrinkageLeast)+")", asPlain(k))
	default:
		w.find("ρ", "least ratio of steel", "24.4.3.2", number(k), asPlain(k))
	}
	w.find("As,o", "steel required in that part", "24.4.3", "ρ bo hf", e.asArea(e.areaIn(e.outerNeed(t, o))))
	w.given("As", "steel of bars there", "", e.asArea(e.areaIn(o.area)))
	return w
}
