package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// Each of these tests falls into a trap on purpose, by hand, shows that the
// value then differs, and holds the right one. Sections are those of shearMids,
// 14 by 20 in. or 350 by 500 mm, unless they say otherwise.

// The size effect is for sections without the least stirrups: not with them,
// and not left out without (318-19, Table 22.5.5.1).
func TestTrap09SizeEffectGoesWithoutStirrups(t *testing.T) {
	for _, e := range []*edition{&us19, &si19} {
		s := shearMids[e]
		bd, root, k, tied := s.bw*s.d, math.Sqrt(s.fc), 8.0, 2.0
		if e.system == units.SI {
			k, tied = 0.66, 0.17
		}
		size := math.Sqrt(2 / 2.7) // d = 17 in. or 425 mm
		right := k * size * math.Cbrt(0.01) * root * bd
		trapped := k * math.Cbrt(0.01) * root * bd // left out
		_, v := s.evaluate(e)
		require.InEpsilon(t, right, v.concrete.strength, 1e-12, e.id)
		require.Greater(t, trapped, 1.1*v.concrete.strength, e.id)

		s.row = beam.RowB
		s.av, s.s = 0.4, 8
		if e.system == units.SI {
			s.av, s.s = 258, 200
		}
		_, v = s.evaluate(e)
		require.InEpsilon(t, trapped, v.concrete.strength, 1e-12, "row (b) has no λs")
		s.row = beam.RowA
		_, v = s.evaluate(e)
		require.InEpsilon(t, tied*root*bd, v.concrete.strength, 1e-12, "nor has row (a)")
		require.Greater(t, v.concrete.strength, 1.01*size*tied*root*bd)
	}
}

// Without stirrups 318-19 asks for Vu of at most φλ√f'c bw d and of at most φVc
// by row (c); 318-14 for at most 0.5φVc, which is no rule of 318-19.
func TestTrap10NoStirrupsAskTwoThings(t *testing.T) {
	// ρw = 0.3 %, d = 30 in.: row (c) is 0.8159 λ√f'c bw d. Between the two lines
	// 9.6.3.1 asks for no stirrups and strength fails.
	for _, e := range []*edition{&us19, &si19} {
		s := shearCase{fc: 4900, lambda: 1, bw: 12, h: 33, d: 30, as: 0.003 * 360, fyt: 60000}
		first := 0.75 * 70 * 360.0
		vc := 8 * math.Sqrt(2/4.0) * math.Cbrt(0.003) * 70 * 360
		if e.system == units.SI {
			s = shearCase{fc: 25, lambda: 1, bw: 300, h: 825, d: 750, as: 0.003 * 225000, fyt: 420}
			first = 0.75 * 0.083 * 5 * 225000
			vc = 0.66 * math.Sqrt(2/4.0) * math.Cbrt(0.003) * 5 * 225000
		}
		s.vu = (first + 0.75*vc) / 2
		_, v := s.evaluate(e)
		require.InEpsilon(t, first, v.trigger, 1e-12, e.id)
		require.InEpsilon(t, 0.75*vc, v.design, 1e-12, e.id)
		require.LessOrEqual(t, v.shear, v.trigger, "the first line alone would let it pass")
		require.Greater(t, v.shear, v.design, e.id)
		require.True(t, v.required, e.id)
		require.NotEqual(t, 0.5*0.75*vc, v.trigger, "0.5φVc is 318-14's")
	}
	// With much steel the other line governs: ρw = 4 %, d = 17 in.
	for _, e := range []*edition{&us19, &us14} {
		s := shearMids[e]
		s.as = 0.04 * 238
		_, v := s.evaluate(e)
		want := 0.75 * 70 * 238.0
		require.InEpsilon(t, want, v.trigger, 1e-12, e.id)
		if e == &us19 {
			require.Greater(t, 0.5*v.design, 1.1*v.trigger, "0.5φVc would be more")
		} else {
			require.InEpsilon(t, 0.5*v.design, v.trigger, 1e-12)
		}
	}
	// A whole beam: 17 kip on 14 by 36 in. with two No. 6, d = 33.75 in.
	b := demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(100), Shear: units.Kip.Of(17)})
	b.Section.Depth = in(36)
	tr := trialOf(t, problemOf(t, ACI31819(), b), "#3", []group{{2, "#6"}}, []group{{2, "#6"}})
	checks := us19.judgeShearing(nil, tr)
	require.Equal(t, beam.Pass, only(t, checks, "shear.minimum-stirrups").Outcome)
	require.Equal(t, beam.Fail, only(t, checks, "shear.strength").Outcome)
}

// ρw and d are those of the face in tension: under a negative moment the top's.
func TestTrap11SteelRatioOfTheTensionFace(t *testing.T) {
	for _, k := range []struct {
		code           Code
		moment, d, as  float64
		wrongD, wrong  float64
		detailedAtHome bool
	}{
		{ACI31819(), -200, 21.75, 0.88, 21.625, 3.95, false},
		{ACI31819(), 200, 21.625, 3.95, 21.75, 0.88, false},
		{ACI31814(), -200, 21.75, 0.88, 21.625, 3.95, true},
	} {
		b := demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(k.moment), Shear: units.Kip.Of(10)})
		b.Readings.ShearMethod = beam.DetailedShear
		tr := trialOf(t, problemOf(t, k.code, b), "#3", []group{{5, "#8"}}, []group{{2, "#6"}})
		vc := func(d, as float64) float64 {
			rho := as / (14 * d)
			if k.detailedAtHome {
				return (1.9*math.Sqrt(4000) + 2500*rho*10*d/(200*12)) * 14 * d
			}
			return 8 * math.Sqrt(2/(1+d/10)) * math.Cbrt(rho) * math.Sqrt(4000) * 14 * d
		}
		got := valueIn(t, only(t, k.code.e.judgeShearing(nil, tr), "shear.strength").Capacity, "lb")
		require.InEpsilon(t, 0.75*vc(k.d, k.as), got, 1e-9)
		require.Greater(t, math.Abs(0.75*vc(k.wrongD, k.wrong)-got), 0.01*got)
	}
	// Bars in the flange of a tee are part of its top steel; bw stays the web's.
	b := usBrief()
	b.Section = beam.Section{Shape: beam.Tee, Width: in(14), Depth: in(24), FlangeThickness: in(5), FlangeWidth: in(60)}
	b.Spans, b.Supports, b.Loads = nil, nil, nil
	b.Demands = []beam.Demand{{Name: "A", Moment: units.KipFoot.Of(-200), Shear: units.Kip.Of(10)}}
	tr := trialOf(t, problemOf(t, ACI31819(), b), "#3", []group{{5, "#8"}}, []group{{2, "#6"}})
	got := valueIn(t, only(t, us19.judgeShearing(nil, tr), "shear.strength").Capacity, "lb")
	require.InEpsilon(t, 0.75*8*math.Sqrt(2/(1+2.175))*math.Cbrt(0.88/(14*21.75))*math.Sqrt(4000)*14*21.75, got, 1e-9)
}

// Compression adds, tension takes away; Nu/(6 Ag) of 318-19 is at most 0.05 f'c;
// Ag is the whole section's, not bw d.
func TestTrap12AxialForce(t *testing.T) {
	for _, e := range []*edition{&us14, &us19, &si14, &si19} {
		s := shearMids[e]
		s.ag = 1.5 * s.bw * s.h // of a tee
		n := 0.08 * s.fc * s.ag
		_, none := s.evaluate(e)
		s.nu = n
		_, pressed := s.evaluate(e)
		s.nu = -n
		_, pulled := s.evaluate(e)
		require.Greater(t, pressed.concrete.strength, none.concrete.strength, e.id)
		require.Less(t, pulled.concrete.strength, none.concrete.strength, e.id)

		want, wrong := 0.0, 0.0
		bd, root := s.bw*s.d, math.Sqrt(s.fc)
		switch e {
		case &us14:
			want, wrong = 2*(1+n/(2000*s.ag))*root*bd, 2*(1+n/(2000*bd))*root*bd
		case &si14:
			want, wrong = 0.17*(1+n/(14*s.ag))*root*bd, 0.17*(1+n/(14*bd))*root*bd
		default:
			want, wrong = none.concrete.strength+n/(6*s.ag)*bd, none.concrete.strength+n/6
		}
		require.InEpsilon(t, want, pressed.concrete.strength, 1e-12, e.id)
		require.Greater(t, wrong, 1.01*want, e.id)

		if e.shear.rowsByStirrups {
			s.as = 1e-4 * bd // so that 5λ√f'c is far
			s.nu = 0
			_, none = s.evaluate(e)
			s.nu = 0.5 * s.fc * s.ag // 0.0833 f'c
			_, capped := s.evaluate(e)
			require.InEpsilon(t, none.concrete.strength+0.05*s.fc*bd, capped.concrete.strength, 1e-12, e.id)
			require.True(t, capped.concrete.axialCapped, e.id)
		}
	}
	// In a beam: a tee under 60 kip, Ag = 14 × 24 + 46 × 5 = 566 in2.
	b := demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(100), Shear: units.Kip.Of(10), Axial: units.Kip.Of(60)})
	b.Section = beam.Section{Shape: beam.Tee, Width: in(14), Depth: in(24), FlangeThickness: in(5), FlangeWidth: in(60)}
	tr := trialOf(t, problemOf(t, ACI31814(), b), "#3", []group{{5, "#8"}}, []group{{2, "#6"}})
	got := valueIn(t, only(t, us14.judgeShearing(nil, tr), "shear.strength").Capacity, "lb")
	require.InEpsilon(t, 0.75*2*(1+60000.0/(2000*566))*math.Sqrt(4000)*14*21.625, got, 1e-9)
}

// The detailed expression of 318-14 is the least of three rows, (b) among them,
// and its Mu is the one that acts with Vu.
func TestTrap13DetailedExpression(t *testing.T) {
	for _, e := range []*edition{&us14, &si14} {
		s := shearMids[e]
		s.method = beam.DetailedShear
		a, b := 1.9, 2500.0
		if e.system == units.SI {
			a, b = 0.16, 17
		}
		s.vu, s.mu = 1e5, 1e5*s.d/3 // Vu d/Mu = 3
		_, v := s.evaluate(e)
		bd := s.bw * s.d
		require.InEpsilon(t, (a*math.Sqrt(s.fc)+b*0.01)*bd, v.concrete.strength, 1e-12, e.id)
		withoutB := min((a*math.Sqrt(s.fc)+3*b*0.01)*bd, e.shear.greatest*math.Sqrt(s.fc)*bd)
		require.Greater(t, withoutB, 1.1*v.concrete.strength, e.id)
	}
	// Two demands: each Vu has its own Mu. A: 30 kip with 80 kip-ft, Vu d/Mu =
	// 0.676; B: 29 kip with 200 kip-ft, 0.261.
	brief := demandBrief(
		beam.Demand{Name: "A", Moment: units.KipFoot.Of(80), Shear: units.Kip.Of(30)},
		beam.Demand{Name: "B", Moment: units.KipFoot.Of(200), Shear: units.Kip.Of(29)},
	)
	brief.Readings.ShearMethod = beam.DetailedShear
	tr := trialOf(t, problemOf(t, ACI31814(), brief), "#3", []group{{5, "#8"}}, []group{{2, "#6"}})
	got := only(t, us14.judgeShearing(nil, tr), "shear.strength")
	rho := 3.95 / (14 * 21.625)
	phiVc := func(v, m float64) float64 {
		return 0.75 * (1.9*math.Sqrt(4000) + 2500*rho*v*21.625/(m*12)) * 14 * 21.625
	}
	a, b := 30000/phiVc(30, 80), 29000/phiVc(29, 200)
	want := max(a, b)
	require.InEpsilon(t, want, got.Utilization, 1e-9)
	require.Greater(t, math.Abs(30000/phiVc(30, 200)-want), 0.005*want, "A with the moment of B")
}

// Stirrups count with at most 60 ksi (420 MPa) in Vs, and in least stirrups.
func TestTrap15StirrupYieldIsCapped(t *testing.T) {
	for _, e := range []*edition{&us14, &us19, &si14, &si19} {
		for _, over := range []float64{1, 4.0 / 3, 5.0 / 3} {
			s := shearMids[e]
			s.av, s.s = 0.4, 8
			if e.system == units.SI {
				s.av, s.s = 258, 200
			}
			most := s.fyt
			s.fyt *= over
			w, _ := s.evaluate(e)
			require.InEpsilon(t, s.av*most*s.d/s.s, w.steel, 1e-12, "%s %g", e.id, s.fyt)
			require.Equal(t, over > 1, w.fytCapped)
			floor := 50.0
			if e.system == units.SI {
				floor = 0.35
			}
			require.InEpsilon(t, floor*s.bw/most, w.byFloor, 1e-12)
			if over > 1 {
				require.Greater(t, s.av*s.fyt*s.d/s.s, 1.3*w.steel)
			}
		}
		// Below the cap they count as they are.
		s := shearMids[e]
		s.av, s.s, s.fyt = 0.4, 8, 0.9*s.fyt
		w, _ := s.evaluate(e)
		require.InEpsilon(t, 0.4*s.fyt*s.d/8, w.steel, 1e-12, e.id)
	}
}

// The class of spacing follows Vs = Vu/φ - Vc required: 4√f'c bw d (0.33 in SI)
// divides it. Neither Vu itself nor the Vs of the stirrups provided does.
func TestTrap16SpacingClassOfRequiredVs(t *testing.T) {
	for _, e := range []*edition{&us14, &us19, &si14, &si19} {
		s := shearMids[e]
		s.av, s.s, s.row = 1.6, 4, beam.RowA
		root, bd, two, four, most := 70.0, 238.0, 2.0, 4.0, 24.0
		if e.system == units.SI {
			s.av, s.s = 1032, 100
			root, bd, two, four, most = 5, 350*425, 0.17, 0.33, 600
		}
		edge := 0.75 * (two + four) * root * bd
		for _, k := range []struct {
			vu    float64
			heavy bool
		}{{edge, false}, {edge * 1.00001, true}, {0.9 * edge, false}} {
			s.vu = k.vu
			w, v := s.evaluate(e)
			require.Equal(t, k.heavy, v.heavy, e.id)
			along, across := min(s.d/2, most), min(s.d, most)
			if k.heavy {
				along, across = min(s.d/4, most/2), min(s.d/2, most/2)
			}
			require.InEpsilon(t, along, v.along, 1e-12, e.id)
			if !e.stirrups.across {
				across = 0
			}
			require.InDelta(t, across, v.across, 1e-9, e.id)
			require.Greater(t, v.shear, w.heavyFrom*0.75, "Vu itself is above the line")
			require.Greater(t, w.steel, w.heavyFrom, "and so is Vs provided")
		}
	}
}

// The 8√f'c bw d of the section limit has no λ (0.66 in SI).
func TestTrap17SectionLimitWithoutLambda(t *testing.T) {
	for _, e := range []*edition{&us14, &us19, &si14, &si19} {
		s := shearMids[e]
		s.lambda = 0.75
		eight := 8.0
		if e.system == units.SI {
			eight = 0.66
		}
		_, v := s.evaluate(e)
		reserve := eight * math.Sqrt(s.fc) * s.bw * s.d
		require.InEpsilon(t, 0.75*(v.concrete.strength+reserve), v.limit, 1e-12, e.id)
		require.Greater(t, v.limit, 1.1*0.75*(v.concrete.strength+0.75*reserve), e.id)
	}
	// The limit fails in a beam from both sides: 14 by 24 in., light stirrups.
	for _, k := range []struct {
		share float64
		want  beam.Outcome
	}{{1, beam.Pass}, {1.0001, beam.Fail}} {
		most := 0.75 * 10 * math.Sqrt(4000) * 14 * 21.625 / 1000
		b := demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(100), Shear: units.Kip.Of(most * k.share)})
		tr := trialOf(t, problemOf(t, ACI31819(), b), "#3", []group{{5, "#8"}}, []group{{2, "#6"}})
		addZone(tr, 2, 10, 0, 0)
		require.Equal(t, k.want, only(t, us19.judgeShearing(nil, tr), "shear.section-limit").Outcome)
	}
}

// The shear at d is used only if nothing forbids it: a point load nearer than d,
// a support or a load that hangs takes the shear at the face.
func TestTrap18ShearAtTheFace(t *testing.T) {
	none := func(*beam.Brief) {}
	for _, k := range []struct {
		name string
		edit func(b *beam.Brief)
		then func(b *beam.Brief) // after the analysis: within 2h of the face a load on top is refused
		note string
	}{
		{"nothing forbids it", none, none, noteAtDepth},
		{"hung support", func(b *beam.Brief) { b.Supports[0].Hung = true }, none, noteHungSupport},
		{"hung load", func(b *beam.Brief) { b.Loads[1].Hung = true }, none, noteHungLoad},
		{"point load within d", none, func(b *beam.Brief) {
			b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(5), At: in(20)})
		}, noteLoadInDepth},
	} {
		for _, c := range Editions() {
			tr := shearTrial(t, c, func(b *beam.Brief) {
				b.Concrete.Density = units.PoundPerCubicFoot.Of(150)
				k.edit(b)
			})
			k.then(&tr.Brief)
			addZone(tr, 2, 6, 6, 258)
			got := checksOf(c.e.judgeShearing(nil, tr), "shear.strength")
			atFace, atDepth := ownShear(6), ownShear(6+tr.EffectiveDepth(beam.Positive).In(units.Inch)) // covers of 1.5 in. or 40 mm
			if k.note == noteAtDepth {
				require.InEpsilon(t, atDepth, valueIn(t, got[0].Demand, "kip"), 1e-9, "%s %s", k.name, c.e.id)
				continue
			}
			require.InEpsilon(t, atFace, valueIn(t, got[0].Demand, "kip"), 1e-9, "%s %s", k.name, c.e.id)
			require.Equal(t, k.note, got[0].Reason)
			require.Greater(t, atFace, 1.1*atDepth, "the trap takes less")
		}
	}
}
