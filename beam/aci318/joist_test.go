package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// joistBrief is a rib of a joist floor of our own: 5 in. by 18 in. with a slab
// of 3 in., 30 in. between ribs.
func joistBrief(edit func(s *beam.Section)) beam.Brief {
	b := usBrief()
	b.Section = beam.Section{
		Shape: beam.Tee, Width: in(5), Depth: in(18), FlangeThickness: in(3), Joist: true,
		Slab: beam.Slab{ClearLeft: in(30), ClearRight: in(30)},
	}
	b.Loads[0].Intensity, b.Loads[1].Intensity = units.KipPerFoot.Of(0.1), units.KipPerFoot.Of(0.1)
	if edit != nil {
		edit(&b.Section)
	}
	return b
}

// 9.8.1.2 to 9.8.1.4 and 9.8.3.1, from both sides, in both systems: ribs of 4 in.
// (100 mm), of 3.5 widths below the slab, 30 in. (750 mm) apart, slabs of a
// twelfth of that and 2 in. (50 mm).
func TestJoistDimensions(t *testing.T) {
	const judged, open = beam.Pass, beam.NotJudged
	type outcomes struct{ width, depth, spacing, slab beam.Outcome }
	for _, k := range []struct {
		name string
		e    *edition
		s    beam.Section
		want outcomes
	}{
		{"as built", &us19, joistBrief(nil).Section, outcomes{judged, judged, judged, judged}},
		{"4 in", &us14, joistBrief(func(s *beam.Section) { s.Width, s.Depth = in(4), in(17) }).Section, outcomes{judged, judged, judged, judged}},
		{"3.99 in", &us14, joistBrief(func(s *beam.Section) { s.Width, s.Depth = in(3.99), in(16) }).Section, outcomes{beam.Fail, judged, judged, judged}},
		{"depth at 3.5 widths", &us19, joistBrief(func(s *beam.Section) { s.Depth = in(3 + 17.5) }).Section, outcomes{judged, judged, judged, judged}},
		{"depth above 3.5 widths", &us19, joistBrief(func(s *beam.Section) { s.Depth = in(3 + 17.51) }).Section, outcomes{judged, beam.Fail, judged, judged}},
		{"30.1 in apart on one side", &us19, joistBrief(func(s *beam.Section) { s.Slab.ClearRight = in(30.1) }).Section, outcomes{judged, judged, beam.Fail, judged}},
		{"slab at a twelfth", &us19, joistBrief(func(s *beam.Section) { s.FlangeThickness = in(2.5) }).Section, outcomes{judged, judged, judged, judged}},
		{"slab below a twelfth", &us19, joistBrief(func(s *beam.Section) { s.FlangeThickness = in(2.49) }).Section, outcomes{judged, judged, judged, beam.Fail}},
		{"slab at 2 in", &us19, joistBrief(func(s *beam.Section) {
			s.FlangeThickness, s.Slab = in(2), beam.Slab{ClearLeft: in(20), ClearRight: in(20)}
		}).Section, outcomes{judged, judged, judged, judged}},
		{"slab below 2 in", &us19, joistBrief(func(s *beam.Section) {
			s.FlangeThickness, s.Slab = in(1.99), beam.Slab{ClearLeft: in(20), ClearRight: in(20)}
		}).Section, outcomes{judged, judged, judged, beam.Fail}},
		// An overhang of 15 in. reaches half way to the next rib, no further.
		{"flange by its width", &us19, joistBrief(func(s *beam.Section) { s.Slab, s.FlangeWidth = beam.Slab{}, in(35) }).Section, outcomes{judged, judged, open, open}},
		{"flange too wide for a joist", &us19, joistBrief(func(s *beam.Section) { s.Slab, s.FlangeWidth = beam.Slab{}, in(35.1) }).Section, outcomes{judged, judged, beam.Fail, open}},
		{"flange too thin", &us19, joistBrief(func(s *beam.Section) {
			s.Slab, s.FlangeWidth, s.FlangeThickness = beam.Slab{}, in(35), in(2.49)
		}).Section, outcomes{judged, judged, open, beam.Fail}},
		{"no slab", &us19, beam.Section{Shape: beam.Rectangular, Width: in(5), Depth: in(17.5), Joist: true}, outcomes{judged, judged, open, open}},
		{"no slab, too deep", &us19, beam.Section{Shape: beam.Rectangular, Width: in(5), Depth: in(17.6), Joist: true}, outcomes{judged, beam.Fail, open, open}},
		{"SI at its limits", &si19, beam.Section{
			Shape: beam.Tee, Width: mm(100), Depth: mm(412.5), FlangeThickness: mm(62.5), Joist: true, Slab: beam.Slab{ClearLeft: mm(750), ClearRight: mm(750)},
		}, outcomes{judged, judged, judged, judged}},
		{"SI beyond all of them", &si14, beam.Section{
			Shape: beam.Tee, Width: mm(99), Depth: mm(412), FlangeThickness: mm(62), Joist: true, Slab: beam.Slab{ClearLeft: mm(751), ClearRight: mm(300)},
		}, outcomes{beam.Fail, beam.Fail, beam.Fail, beam.Fail}},
		{"SI slab at 50 mm", &si14, beam.Section{
			Shape: beam.Tee, Width: mm(100), Depth: mm(300), FlangeThickness: mm(50), Joist: true, Slab: beam.Slab{ClearLeft: mm(500), ClearRight: mm(500)},
		}, outcomes{judged, judged, judged, judged}},
		{"SI slab below 50 mm", &si14, beam.Section{
			Shape: beam.Tee, Width: mm(100), Depth: mm(300), FlangeThickness: mm(49.9), Joist: true, Slab: beam.Slab{ClearLeft: mm(500), ClearRight: mm(500)},
		}, outcomes{judged, judged, judged, beam.Fail}},
	} {
		t.Run(k.name, func(t *testing.T) {
			tr := &beam.Trial{Problem: &beam.Problem{}, Record: true}
			g, faults := beam.GeometryOf(&k.s)
			require.Empty(t, faults)
			tr.Brief.Section, tr.Geometry = k.s, g
			if k.s.Shape == beam.Tee && !k.s.Slab.IsZero() {
				tr.Geometry.Web = k.s.Width
			}
			checks := k.e.appendJoist(nil, tr)
			sound := true
			for id, want := range map[string]beam.Outcome{
				"joist.rib-width": k.want.width, "joist.rib-depth": k.want.depth, "joist.spacing": k.want.spacing, "joist.slab": k.want.slab,
			} {
				c := only(t, checks, id)
				require.Equal(t, want, c.Outcome, id)
				require.NotEmpty(t, c.Reason, id)
				sound = sound && want != beam.Fail
				if want != beam.NotJudged {
					requireEvaluable(t, &c)
				}
			}
			require.Len(t, checks, 4)
			require.Equal(t, sound, k.e.joistRib(&k.s, &tr.Geometry).sound(k.e))
		})
	}
	require.Empty(t, us19.appendJoist(nil, &beam.Trial{Problem: &beam.Problem{}}), "no joist")
}

// 9.8.1.5: Vc of a joist within the limits is 1.1 times that of 22.5, and it
// needs stirrups only above φVc; a rib beyond a limit is a beam like any other
// (9.8.1.8).
func TestJoistShear(t *testing.T) {
	for _, k := range []struct {
		name   string
		edit   func(s *beam.Section)
		factor float64
	}{
		{"joist", nil, 1.1},
		{"not said to be one", func(s *beam.Section) { s.Joist = false }, 1},
		{"ribs too far apart", func(s *beam.Section) { s.Slab.ClearLeft, s.Slab.ClearRight = in(31), in(31) }, 1},
	} {
		for _, c := range []Code{ACI31819(), ACI31814()} {
			p := problemOf(t, c, joistBrief(k.edit))
			tr := trialOf(t, p, "", []group{{2, "#5"}}, []group{{2, "#4"}})
			tr.Record = true
			checks := c.e.judgeShearing(nil, tr)
			got := only(t, checks, "shear.strength")
			requireEvaluable(t, &got)
			d := tr.EffectiveDepth(beam.Positive).In(units.Inch)
			want := 2 * math.Sqrt(4000) * 5 * d
			if c.e == &us19 {
				want = 8 * math.Sqrt(2/(1+d/10)) * math.Cbrt(0.62/(5*d)) * math.Sqrt(4000) * 5 * d
			}
			require.InEpsilon(t, 0.75*k.factor*want, valueIn(t, got.Capacity, "lb"), 1e-9, "%s %s", k.name, c.e.id)
			least := only(t, checks, "shear.minimum-stirrups")
			requireEvaluable(t, &least)
			trigger := 0.75 * math.Sqrt(4000) * 5 * d // of 318-19; 0.5 φ 2√f'c bw d of 318-14 is the same
			if k.factor > 1 {
				trigger = 0.75 * 1.1 * want
			}
			require.InEpsilon(t, trigger, valueIn(t, least.Capacity, "lb"), 1e-9, "%s %s", k.name, c.e.id)
		}
	}
	// The 1.1 is on what is left after the cap of 22.5.5.1.1, and on every row of
	// 318-14: own calculation, √f'c = 70 psi, bw d = 14 × 17 in2.
	s := shearMids[&us19]
	s.joist, s.as, s.av, s.s = true, 0.27*238, 0.4, 8
	_, v := s.evaluate(&us19)
	require.InEpsilon(t, 1.1*5*70*238, v.concrete.strength, 1e-12)
	require.InEpsilon(t, 5*70*238, v.concrete.ordinary, 1e-12)
	require.InEpsilon(t, 0.75*(1.1*5+8)*70*238, v.limit, 1e-12)
	s.nu, s.h = -23800, 20
	_, v = s.evaluate(&us14)
	require.InEpsilon(t, 1.1*2*(1-23800.0/(500*280))*70*238, v.concrete.strength, 1e-12)
}
