package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// torsionOf measures a section and evaluates it.
func torsionOf(t testing.TB, e *edition, s beam.Section, c *beam.Concrete, axial units.Force) torsionStrength {
	t.Helper()
	g, faults := beam.GeometryOf(&s)
	require.Empty(t, faults)
	return e.torsionStrength(&s, &g, c, axial)
}

// 22.7.4.1 and 22.7.5.1 of a solid rectangle. Own calculations: 16 by 28 in.,
// Acp = 448 in2, pcp = 88 in.
func TestThresholdAndCrackingTorsion(t *testing.T) {
	section := beam.Section{Shape: beam.Rectangular, Width: units.Inch.Of(16), Depth: units.Inch.Of(28)}
	unit := 448.0 * 448 / 88
	for _, c := range []struct {
		name     string
		e        *edition
		concrete beam.Concrete
		axial    units.Force
		root     float64
		factor   float64
	}{
		{"4000 psi", &us19, beam.Concrete{Strength: units.PSI.Of(4000)}, units.Force{}, math.Sqrt(4000), 1},
		{"sand-lightweight, 318-14", &us14, beam.Concrete{Strength: units.PSI.Of(4000), Kind: beam.SandLightweight, Density: units.PoundPerCubicFoot.Of(110)},
			units.Force{}, 0.85 * math.Sqrt(4000), 1},
		{"root capped at 100 psi whatever the stirrups", &us19, beam.Concrete{Strength: units.PSI.Of(14400)}, units.Force{}, 100, 1},
		{"compression", &us19, beam.Concrete{Strength: units.PSI.Of(4900)}, units.Kip.Of(100), 70, math.Sqrt(1 + 100000/(4*448*70.0))},
		{"tension", &us19, beam.Concrete{Strength: units.PSI.Of(4900)}, units.Kip.Of(-100), 70, math.Sqrt(1 - 100000/(4*448*70.0))},
		{"so much tension leaves nothing", &us19, beam.Concrete{Strength: units.PSI.Of(4900)}, units.Kip.Of(-200), 70, 0},
	} {
		t.Run(c.name, func(t *testing.T) {
			s := torsionOf(t, c.e, section, &c.concrete, c.axial)
			require.InDelta(t, c.root*unit*c.factor, s.threshold, 1e-6)
			require.InDelta(t, 4*c.root*unit*c.factor, s.cracking, 1e-6)
		})
	}
	metric := beam.Section{Shape: beam.Rectangular, Width: units.Millimetre.Of(400), Depth: units.Millimetre.Of(700)}
	concrete := beam.Concrete{Strength: units.Megapascal.Of(25)}
	s := torsionOf(t, &si19, metric, &concrete, units.Kilonewton.Of(200))
	unit = 5 * 280000.0 * 280000 / 2200 * math.Sqrt(1+200000/(0.33*280000*5.0))
	require.InEpsilon(t, 0.083*unit, s.threshold, 1e-12)
	require.InEpsilon(t, 0.33*unit, s.cracking, 1e-12)
}

// A torque below φTth is neglected, one equal to it is not (9.5.4.1).
func TestTorqueThreshold(t *testing.T) {
	section := usBrief().Section
	concrete := usBrief().Concrete
	limit := 0.75 * math.Sqrt(4000) * 336 * 336 / 76 // lb-in.
	s := torsionOf(t, &us19, section, &concrete, units.Force{})
	for _, c := range []struct {
		share float64
		want  bool
	}{{0.999999, true}, {1, false}, {1.000001, false}} {
		require.Equal(t, c.want, s.neglects(limit*c.share), "%g", c.share)
	}

	edge := trialOf(t, problemOf(t, ACI31819(), demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(50)})), "#3", []group{{5, "#8"}}, []group{{2, "#6"}})
	edge.Forces.Demands()[0].Torque = units.PoundInch.Of(limit)
	require.True(t, us19.twists(edge.Problem))
	require.Equal(t, beam.NotApplicable, only(t, us19.judgeTorsion(nil, edge), "torsion.threshold").Outcome)

	below := beam.Load{Case: beam.Dead, Shape: beam.Torque, Moment: units.PoundInch.Of(1), At: units.Foot.Of(11)}
	tr := shearTrial(t, ACI31819(), func(b *beam.Brief) {
		// 1.4D: half of the torque to each end.
		below.Moment = units.PoundInch.Of(limit / 0.7 * 0.9)
		b.Loads = append(b.Loads, below)
	})
	tr.Record = true
	got := only(t, us19.judgeTorsion(nil, tr), "torsion.threshold")
	require.Equal(t, beam.Pass, got.Outcome)
	require.InEpsilon(t, 0.9, got.Utilization, 1e-9)
	requireEvaluable(t, &got)
	require.Equal(t, beam.NotApplicable, only(t, us19.judgeTorsion(nil, shearTrial(t, ACI31819(), nil)), "torsion.threshold").Outcome)

	strong := demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(50), Torque: units.PoundInch.Of(0.5 * limit), Axial: units.Kip.Of(20)})
	strong.Concrete.Strength = units.PSI.Of(12000)
	p := problemOf(t, ACI31819(), strong)
	tr = trialOf(t, p, "#3", []group{{5, "#8"}}, []group{{2, "#6"}})
	tr.Record = true
	got = only(t, us19.judgeTorsion(nil, tr), "torsion.threshold")
	require.Equal(t, "A", got.Combination)
	requireEvaluable(t, &got)
}

// The factor for an axial force goes by Ag of the whole section (22.7.4.1,
// 22.7.5.1), whatever of its flanges counts in Acp. Own calculation: a tee of 12
// by 24 in. with a flange of 100 by 2 in. leaves Acp at 288 in2, while Ag is
// 288 + 88 × 2 = 464 in2.
func TestAxialFactorOfTorsionGoesByTheWholeSection(t *testing.T) {
	b := demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(100), Shear: units.Kip.Of(10), Torque: units.KipFoot.Of(6.8), Axial: units.Kip.Of(100)})
	b.Section = beam.Section{Shape: beam.Tee, Width: in(12), Depth: in(24), FlangeThickness: in(2), FlangeWidth: in(100)}
	tr := trialOf(t, problemOf(t, ACI31819(), b), "#3", []group{{3, "#8"}}, []group{{2, "#6"}})
	tr.Record = true
	c := only(t, us19.judgeTorsion(nil, tr), "torsion.threshold")
	root := math.Sqrt(4000)
	factor := math.Sqrt(1 + 100000/(4*464*root))
	require.InEpsilon(t, 0.75*root*288*288/72*factor, valueIn(t, c.Capacity, "kip-ft")*12000, 1e-9)
	require.Equal(t, beam.NotApplicable, c.Outcome, "6.8 kip-ft is not below 6.2")
	require.True(t, us19.twists(tr.Problem))
	requireEvaluable(t, &c)

	// So it does without the hollows of a box, whose threshold goes by its
	// concrete squared.
	s := torsionOf(t, &us19, box(5), &b.Concrete, units.Kip.Of(100))
	require.InEpsilon(t, math.Sqrt(1+100000/(4*s.gross*root)), s.axialFactor, 1e-12)
	require.Less(t, s.gross, s.enclosed)
}

// An outline counts with the overhangs of 9.2.4.4, as a tee of its size does.
func TestOutlineCountsLikeTheTeeThatItIs(t *testing.T) {
	points := func(xy ...float64) (p []beam.Point) {
		for i := 0; i < len(xy); i += 2 {
			p = append(p, beam.Point{X: in(xy[i]), Y: in(xy[i+1])})
		}
		return p
	}
	concrete := beam.Concrete{Strength: psi(4000)}
	of := func(s beam.Section) torsionStrength { return torsionOf(t, &us19, s, &concrete, units.Force{}) }
	tee := func(web, depth, flange, width float64) beam.Section {
		return beam.Section{Shape: beam.Tee, Width: in(web), Depth: in(depth), FlangeThickness: in(flange), FlangeWidth: in(width)}
	}
	drawn := func(web, depth, flange, width float64) beam.Section {
		l, r := (width-web)/2, (width+web)/2
		return beam.Section{Shape: beam.Polygon, Outline: points(0, depth, 0, depth-flange, l, depth-flange, l, 0, r, 0, r, depth-flange, width, depth-flange, width, depth)}
	}
	for _, v := range [][4]float64{{12, 24, 4, 60}, {12, 24, 4, 44}, {12, 24, 4, 30}, {12, 24, 2, 100}, {24, 24, 8, 80}, {30, 30, 11, 100}} {
		want, got := of(tee(v[0], v[1], v[2], v[3])), of(drawn(v[0], v[1], v[2], v[3]))
		require.InEpsilon(t, want.enclosed, got.enclosed, 1e-9, "%v", v)
		require.InEpsilon(t, want.perimeter, got.perimeter, 1e-9, "%v", v)
		require.InEpsilon(t, want.threshold, got.threshold, 1e-9, "%v", v)
	}
	// 16 in. a side of 4 in.: 288 + 32 × 4 = 416 in2 within 72 + 64 = 136 in.
	s := of(drawn(12, 24, 4, 60))
	require.InEpsilon(t, math.Sqrt(4000)*416*416/136, s.threshold, 1e-9)
	require.True(t, s.counted && s.cut)
	require.False(t, of(drawn(12, 24, 4, 44)).cut, "just as much as counts")

	// 12 in. of 24 are no flange but a part of the web; less are.
	stem := func(thick float64) beam.Section { return drawn(12, 24, thick, 60) }
	require.InEpsilon(t, 12*24+48*12.0, of(stem(12)).enclosed, 1e-9)
	require.InEpsilon(t, 12*24+2*(24-11.9)*11.9, of(stem(11.9)).enclosed, 1e-9)

	// One side by its own thickness: on the left a flange, on the right a block.
	s = of(beam.Section{Shape: beam.Polygon, Outline: points(0, 24, 0, 20, 40, 20, 40, 0, 52, 0, 52, 10, 70, 10, 70, 24)})
	require.InEpsilon(t, 12*24+16*4+18*14.0, s.enclosed, 1e-9)
	require.InEpsilon(t, 2*(12+16+18+24.0), s.perimeter, 1e-9)
}

// A torque that the whole outline would let be neglected is designed for where
// the flange counts as 9.2.4.4 has it, and the working says so.
func TestOutlineWithAWideFlange(t *testing.T) {
	for torque, want := range map[float64]beam.Outcome{5.02: beam.Pass, 5.129: beam.NotApplicable} {
		r := twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) {
			at := func(x, y float64) beam.Point { return beam.Point{X: in(x), Y: in(y)} }
			b.Section = beam.Section{Shape: beam.Polygon, Outline: []beam.Point{at(0, 24), at(0, 20), at(24, 20), at(24, 0), at(36, 0), at(36, 20), at(60, 20), at(60, 24)}}
			b.Demands[0] = beam.Demand{Name: "A", Moment: units.KipFoot.Of(100), Shear: units.Kip.Of(10), Torque: units.KipFoot.Of(torque)}
			l.Longitudinal = []beam.Row{bottom(3, "#9"), top(2, "#5")}
		})
		c := find1(t, r, "torsion.threshold")
		require.Equal(t, want, c.Outcome, "%g", torque)
		require.InEpsilon(t, 0.75*math.Sqrt(4000)*416*416/136/12000, valueIn(t, c.Capacity, "kip-ft"), 1e-9)
		requireEvaluable(t, c)
		require.Contains(t, notesOf(c), "9.2.4.4")
		found := false
		for _, a := range r.Assumptions {
			found = found || a.ID == "reading.torsion-outline"
		}
		require.True(t, found)
	}
}

// Judging an outline in torsion allocates nothing either.
func TestJudgingAnOutlineInTorsionAllocatesNothing(t *testing.T) {
	at := func(x, y float64) beam.Point { return beam.Point{X: in(x), Y: in(y)} }
	c := ACI31819()
	_, trial := twistedTrial(t, c, func(b *beam.Brief, l *beam.Layout) {
		twistedSpan(40, 9)(b, l)
		b.Section = beam.Section{Shape: beam.Polygon, Outline: []beam.Point{at(0, 28), at(0, 24), at(24, 24), at(24, 0), at(40, 0), at(40, 24), at(64, 24), at(64, 28)}}
	})
	require.True(t, trial.Twisted)
	trial.Record = false
	var dst []beam.Check
	for _, g := range []beam.Group{beam.Shearing, beam.Bending, beam.Whole} {
		dst = c.Judge(dst[:0], g, trial)
		require.Zero(t, testing.AllocsPerRun(20, func() { dst = c.Judge(dst[:0], g, trial) }), "group %d", g)
	}
}
