package secondcode

import (
	"fmt"
	"math"

	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// Judge appends the checks of a group.
func (c Code) Judge(dst []beam.Check, g beam.Group, t *beam.Trial) []beam.Check {
	switch g {
	case beam.Fitting:
		return c.fitting(dst, t)
	case beam.Bending:
		for _, s := range [2]beam.Sense{beam.Positive, beam.Negative} {
			dst = c.bending(dst, t, s)
		}
	case beam.Shearing:
		return c.shearing(dst, t)
	case beam.Whole:
		return c.whole(dst, t)
	}
	return dst
}

// compared is a check of two amounts.
func compared(id, clause string, face beam.Face, demand, capacity units.Amount) beam.Check {
	c := beam.Check{ID: id, Clause: clause, Face: face}
	c.Compare(demand, capacity)
	return c
}

func (Code) fitting(dst []beam.Check, t *beam.Trial) []beam.Check {
	for _, face := range [2]beam.Face{beam.Bottom, beam.Top} {
		f := t.Steel(face)
		if f.Count == 0 {
			continue
		}
		dst = append(dst, compared("fit.width", "F1", face, f.Fit.LeastWidth.Amount(), t.Brief.Section.Width.Amount()))
		if v := f.Fit.Vertical(); v.Exists() {
			dst = append(dst, compared("fit.layers", "F2", face, v.Required.Amount(), v.Clear.Amount()))
		}
		dst = append(dst, compared("fit.height", "F3", face, f.Fit.Height.Amount(), t.Brief.Section.Depth.Scale(0.5).Amount()))
		dst = append(dst, compared("fit.holders", "F4", face, units.Plain(2), units.Plain(float64(f.Fit.Layers[0].Count))))
	}
	return dst
}

func (c Code) bending(dst []beam.Check, t *beam.Trial, s beam.Sense) []beam.Check {
	a, bent := greatest(t.Problem, s)
	if !bent {
		return append(dst, beam.NotApplicableCheck("bending.strength", "B1", "not bent so"))
	}
	face := s.TensionFace()
	steel := t.Steel(face)
	strength := beam.Check{
		ID: "bending.strength", Clause: "B1", Face: face,
		Span: a.Span, At: a.At, HasAt: a.Span > 0, Combination: a.Combination,
	}
	law, err := mechanics.RectangularBlock(units.Megapascal.Of(designStress(&t.Brief)), blockFactor, crushing)
	if err == nil && steel.Count > 0 {
		section := mechanics.Section{Parts: t.Geometry.Parts, Layers: t.Layers(s, units.Megapascal.Of(steelModulus))}
		for i := range section.Layers {
			fy := &section.Layers[i].Steel.Yield
			*fy = units.Megapascal.Of(designYield(*fy))
		}
		var bending mechanics.Bending
		if s == beam.Negative {
			bending.Sense = mechanics.Hogging
		}
		err = t.Solver.Ultimate(&t.Ultimate, section, law, bending)
	}
	if err != nil || steel.Count == 0 {
		strength.Compare(a.Moment.Abs().Amount(), units.Moment{}.Amount())
		return append(dst, strength)
	}
	strength.Compare(a.Moment.Abs().Amount(), t.Ultimate.Nominal.Amount())
	d := t.EffectiveDepth(s)
	dst = append(dst, strength,
		compared("bending.axis", "B2", face, t.Ultimate.NeutralAxis.Amount(), d.Scale(axisMost).Amount()),
		compared("bending.least", "B3", face, t.Brief.Section.Width.MulLength(d).Scale(leastRatio).Amount(), steel.Area.Amount()),
		compared("bending.pitch", "B4", face, steel.Fit.Layers[0].Spacing.Amount(), units.Millimetre.Of(barPitchMost).Amount()))
	return dst
}

// shearing judges every zone at its greatest shear, and asks for zones from
// face to face.
func (c Code) shearing(dst []beam.Check, t *beam.Trial) []beam.Check {
	for _, d := range t.Forces.Demands() {
		z := -1
		if len(t.Zones) > 0 {
			z = 0
		}
		dst = c.shear(dst, t, z, d)
	}
	for span := 1; span <= t.Forces.Spans(); span++ {
		from, to := t.Faces(span)
		reached := from
		for k := range t.Zones {
			z := &t.Zones[k]
			if z.Span != span {
				continue
			}
			if z.From.AtMost(reached) {
				reached = reached.Max(z.To)
			}
			if a, ok := t.Forces.Shear(span, z.From.Max(from).Min(to), z.To.Min(to).Max(from)); ok {
				dst = c.shear(dst, t, k, a)
			}
		}
		check := beam.Check{ID: "shear.extent", Clause: "V5", Span: span}
		check.Compare(to.Sub(from).Amount(), reached.Sub(from).Amount())
		dst = append(dst, check)
	}
	return dst
}

func (c Code) shear(dst []beam.Check, t *beam.Trial, zone int, a beam.Action) []beam.Check {
	b := t.Brief.Section.Width.In(units.Millimetre)
	d := math.Inf(1) // the lesser of the faces that are in tension somewhere
	for _, s := range [2]beam.Sense{beam.Positive, beam.Negative} {
		if _, bent := greatest(t.Problem, s); bent {
			d = math.Min(d, t.EffectiveDepth(s).In(units.Millimetre))
		}
	}
	if math.IsInf(d, 1) {
		d = t.EffectiveDepth(beam.Positive).In(units.Millimetre)
	}
	fc := t.Brief.Concrete.Strength.In(units.Megapascal)
	fy := designYield(t.Brief.Reinforcement.StirrupYield)
	v := a.Shear.Abs()
	at := func(check beam.Check) beam.Check {
		check.Span, check.At, check.HasAt, check.Combination = a.Span, a.At, a.Span > 0, a.Combination
		return check
	}
	if zone < 0 {
		return append(dst, at(compared("shear.plain", "V1", 0, v.Amount(), units.Newton.Of(plainShear*math.Sqrt(fc)*b*d/concreteFactor).Amount())))
	}
	z := &t.Zones[zone]
	s := z.Spacing.In(units.Millimetre)
	area := bars.TotalArea(bars.Group{Size: t.ZoneBar[zone], Count: z.Legs}).In(units.SquareMillimetre)
	inside := b - 2*t.Cover.In(units.Millimetre) - t.ZoneBar[zone].Diameter.In(units.Millimetre)
	return append(dst,
		at(compared("shear.stirrups", "V2", 0, v.Amount(), units.Newton.Of(area/s*fy*leverArm*d).Amount())),
		at(compared("shear.crushing", "V3", 0, v.Amount(), units.Newton.Of(crushingShear*fc/concreteFactor*b*leverArm*d).Amount())),
		at(compared("shear.least", "V4", 0, units.SquareMillimetrePerMillimetre.Of(leastStirrups*math.Sqrt(fc)*b/t.Brief.Reinforcement.StirrupYield.In(units.Megapascal)).Amount(),
			units.SquareMillimetrePerMillimetre.Of(area/s).Amount())),
		at(compared("shear.spacing", "V6", 0, z.Spacing.Amount(), units.Millimetre.Of(math.Min(spacingMost, spacingShare*d)).Amount())),
		at(compared("shear.across", "V7", 0, units.Millimetre.Of(inside/float64(z.Legs-1)).Amount(), units.Millimetre.Of(acrossMost).Amount())))
}

func (Code) whole(dst []beam.Check, t *beam.Trial) []beam.Check {
	for i, l := range t.Brief.Spans {
		c := beam.Check{ID: "whole.slenderness", Clause: "W1", Span: i + 1}
		c.Compare(units.Plain(l.Ratio(t.Brief.Section.Depth)), units.Plain(slenderMost))
		dst = append(dst, c)
	}
	return append(dst, beam.NotJudgedCheck("deflection", "W2", fmt.Sprintf("%s has no deflection rule", ID)))
}
