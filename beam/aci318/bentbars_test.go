package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// Own calculations from 22.5.10.5.4 of 318-14 and 22.5.8.5.4 of 318-19: Av fyt
// (sin α + cos α) d/s at 45 degrees and steeper, with fyt of at most 60 ksi (420
// MPa), and nothing flatter.
func TestInclinedStirrups(t *testing.T) {
	us := shearCase{fc: 4900, lambda: 1, bw: 14, h: 20, d: 17, as: 2, fyt: 80000, av: 0.4, s: 8}
	si := shearCase{fc: 25, lambda: 1, bw: 350, h: 500, d: 425, as: 1500, fyt: 550, av: 258, s: 200}
	upright := map[*edition]float64{}
	for _, e := range []*edition{&us14, &us19} {
		upright[e] = 0.4 * 60000 * 17 / 8
	}
	for _, e := range []*edition{&si14, &si19} {
		upright[e] = 258 * 420 * 425.0 / 200
	}
	for _, k := range []struct {
		angle, lever float64
		counts       bool
	}{
		{0, 1, true},
		{90, 1, true},
		{45, math.Sqrt2, true},
		{60, 0.5 + math.Sqrt(3)/2, true},
		{44.999, 0, false},
	} {
		for e, want := range upright {
			c := us
			if e.system == units.SI {
				c = si
			}
			c.angle = k.angle
			w, s := c.evaluate(e)
			require.InDelta(t, want*k.lever, w.steel, 1e-9*want, "%s %g", e.id, k.angle)
			require.Equal(t, !k.counts, w.flat, "%s %g", e.id, k.angle)
			require.Equal(t, k.counts, w.enough, "%s %g", e.id, k.angle)
			require.InDelta(t, s.concrete.strength+want*k.lever, s.nominal, 1e-9*want)
		}
	}
}

// 9.7.6.2.3 drawn: a line at 45 degrees from mid-depth down towards the reaction
// to the tension steel, d/2 along the beam, crosses a leg that rises towards the
// reaction if legs are no further apart than d/2 (1 + cot α).
func TestLinesAcrossInclinedStirrups(t *testing.T) {
	for _, angle := range []float64{45, 60, 75, 90} {
		w, _ := shearCase{fc: 4900, lambda: 1, bw: 14, h: 20, d: 17, as: 2, fyt: 60000, av: 0.4, s: 4, angle: angle}.evaluate(&us19)
		cot := 1 / math.Tan(angle*math.Pi/180)
		most := w.mostInclined(false)
		require.InEpsilon(t, 8.5*(1+cot), most, 1e-12)
		require.InEpsilon(t, 8.5*(1+cot)/2, w.mostInclined(true), 1e-12)
		// Legs at 0, s, 2s at the level of the steel; the line starts at x at
		// mid-depth. Seek a line that crosses none.
		missed := func(s float64) bool {
			for k := range 1000 {
				x, crossed := 10*s+s*float64(k)/1000, false
				for n := range 30 {
					foot := s * float64(n)
					crossed = crossed || x-8.5 <= foot && x >= foot-8.5*cot
				}
				if !crossed {
					return true
				}
			}
			return false
		}
		require.False(t, missed(most*0.999), "%g degrees", angle)
		require.True(t, missed(most*1.01), "%g degrees", angle)
	}
}

// inclinedTrial is the beam of the shear tests with stirrups that lean.
func inclinedTrial(t *testing.T, c Code, angle float64) *beam.Trial {
	tr := shearTrial(t, c, nil)
	tr.Record = true
	addZone(tr, 2, 10, 6, 132)
	addZone(tr, 2, 10, 132, 258)
	for i := range tr.Zones {
		tr.Zones[i].Angle = angle
	}
	return tr
}

func TestInclinedStirrupsInABeam(t *testing.T) {
	for _, c := range Editions() {
		tr := inclinedTrial(t, c, 60)
		checks := c.e.judgeShearing(nil, tr)
		for _, id := range []string{"shear.stirrup-angle", "shear.spacing-inclined"} {
			found := checksOf(checks, id)
			require.Len(t, found, 2, id)
			require.Equal(t, beam.Pass, found[0].Outcome)
		}
		require.Equal(t, c.e.stirrups.slopeClause, checksOf(checks, "shear.stirrup-angle")[0].Clause)
		for i := range checks {
			if len(checks[i].Steps) > 0 {
				requireEvaluable(t, &checks[i])
			}
		}
	}
	tr := inclinedTrial(t, ACI31819(), 60)
	got := checksOf(us19.judgeShearing(nil, tr), "shear.strength")
	lever := 0.5 + math.Sqrt(3)/2
	require.InEpsilon(t, 0.75*(2*math.Sqrt(4000)*14*21.625+0.22*60000*lever*21.625/10), valueIn(t, got[0].Capacity, "lb"), 1e-9)
	require.InEpsilon(t, ownShear(27.625), valueIn(t, got[0].Demand, "kip"), 1e-9)
	spacing := checksOf(us19.judgeShearing(nil, tr), "shear.spacing-inclined")[1]
	require.InEpsilon(t, 21.625/2*(1+1/math.Sqrt(3)), valueIn(t, spacing.Capacity, "in"), 1e-9)

	// Flatter than 45 degrees they are as good as none, and that fails.
	tr = inclinedTrial(t, ACI31819(), 44)
	checks := us19.judgeShearing(nil, tr)
	require.Equal(t, beam.Fail, checksOf(checks, "shear.stirrup-angle")[0].Outcome)
	strength := checksOf(checks, "shear.strength")[0]
	row := 8 * math.Sqrt(2/(1+2.1625)) * math.Cbrt(3.95/(14*21.625)) * math.Sqrt(4000) * 14 * 21.625
	require.InEpsilon(t, 0.75*row, valueIn(t, strength.Capacity, "lb"), 1e-9)
	require.Equal(t, beam.Fail, strength.Outcome)
	require.Equal(t, noteFlat, strength.Reason)
	requireEvaluable(t, &strength)

	// Upright ones are asked nothing of the kind.
	for _, angle := range []float64{0, 90} {
		checks = us19.judgeShearing(nil, inclinedTrial(t, ACI31819(), angle))
		require.Empty(t, checksOf(checks, "shear.stirrup-angle"))
		require.Empty(t, checksOf(checks, "shear.spacing-inclined"))
	}
}

// Stirrups lean one way: in a zone over the whole span they stand against the
// greater of the two end shears, and are no help at the other end.
func TestInclinedStirrupsDoNotHelpTheOtherWay(t *testing.T) {
	for _, leftHeavy := range []bool{true, false} {
		tr := shearTrial(t, ACI31819(), func(b *beam.Brief) {
			at := units.Foot.Of(8)
			if !leftHeavy {
				at = units.Foot.Of(14)
			}
			b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(10), At: at})
		})
		addZone(tr, 2, 6, 6, 258)
		tr.Zones[0].Angle = 45
		got := only(t, us19.judgeShearing(nil, tr), "shear.strength")
		require.Equal(t, beam.Fail, got.Outcome)
		require.Equal(t, noteWayward, got.Reason)
		require.Equal(t, leftHeavy, got.At.In(units.Inch) > 132, "the far end is judged without them")
		row := 8 * math.Sqrt(2/(1+2.1625)) * math.Cbrt(3.95/(14*21.625)) * math.Sqrt(4000) * 14 * 21.625
		require.InEpsilon(t, 0.75*row, valueIn(t, got.Capacity, "lb"), 1e-9)
		least := only(t, us19.judgeShearing(nil, tr), "shear.minimum-stirrups")
		require.Equal(t, beam.Pass, least.Outcome, "the worst by 9.6.3.1 is judged where they stand right")
	}
	// Demands of both signs: they stand against the greater.
	b := demandBrief(
		beam.Demand{Name: "A", Moment: units.KipFoot.Of(50), Shear: units.Kip.Of(40)},
		beam.Demand{Name: "B", Moment: units.KipFoot.Of(50), Shear: units.Kip.Of(-38)},
	)
	tr := trialOf(t, problemOf(t, ACI31819(), b), "#3", []group{{5, "#8"}}, []group{{2, "#6"}})
	addZone(tr, 2, 10, 0, 0)
	tr.Zones[0].Angle = 45
	got := only(t, us19.judgeShearing(nil, tr), "shear.strength")
	require.Equal(t, "B", got.Combination)
	require.Equal(t, noteWayward, got.Reason)
}

// bend adds bars bent across the web, at a place in inches.
func bend(t *testing.T, tr *beam.Trial, b beam.BentBars) {
	t.Helper()
	size, err := tr.Catalog.Size(b.Bar)
	require.NoError(t, err)
	b.Span = 1
	b.Bends = max(b.Bends, 1)
	tr.Bent, tr.BentBar = append(tr.Bent, b), append(tr.BentBar, size)
}

// bentTrial is the beam of the shear tests without the stirrups that it needs,
// so that bent bars decide: the slope of a No. 8 is 24 - 2 (1.5 + 0.375) - 1 =
// 19.25 in. high, effective over 3/8 × 19.25 = 7.21875 in. on each side at 45
// degrees.
func bentTrial(t *testing.T, c Code, bars ...beam.BentBars) *beam.Trial {
	tr := shearTrial(t, c, nil)
	tr.Record = true
	addZone(tr, 2, 10, 6, 258)
	for _, b := range bars {
		bend(t, tr, b)
	}
	return tr
}

// A single group carries Av fy sin α, no more than 3√f'c bw d (22.5.10.6.2 of
// 318-14, 22.5.8.6.2 of 318-19), with fy of at most 60 ksi.
func TestSingleBentGroup(t *testing.T) {
	for _, k := range []struct {
		name  string
		group bentGroup
		e     *edition
		want  float64
	}{
		// 2 No. 8 at 45 degrees: 1.58 × 60,000 × 0.7071 = 67,034 lb > 3 × 70 × 238 = 49,980 lb.
		{"capped", bentGroup{area: 1.58, fy: 60000, slope: slopeOf(45), height: 15}, &us19, 3 * 70 * 238},
		{"0.79 in2", bentGroup{area: 0.79, fy: 60000, slope: slopeOf(45), height: 15}, &us14, 0.79 * 60000 * math.Sqrt2 / 2},
		{"at 30 degrees", bentGroup{area: 0.79, fy: 60000, slope: slopeOf(30), height: 15}, &us19, 0.79 * 60000 * 0.5},
		{"flatter than 30 degrees", bentGroup{area: 0.79, fy: 60000, slope: slopeOf(29.99), height: 15}, &us19, 0},
		{"SI", bentGroup{area: 510, fy: 420, slope: slopeOf(45), height: 380}, &si14, 510 * 420 * math.Sqrt2 / 2},
		{"SI capped", bentGroup{area: 1530, fy: 420, slope: slopeOf(45), height: 380}, &si19, 0.25 * 5 * 350 * 425},
	} {
		s := shearMids[k.e]
		s.bent = k.group.share(s.d)
		_, v := s.evaluate(k.e)
		require.InDelta(t, k.want, v.bent, 1e-9*(1+k.want), k.name)
		require.InDelta(t, v.concrete.strength+k.want, v.nominal, 1e-9*(1+k.want), k.name)
	}
	// √f'c of the limit has no cap: the cap of 22.5.3.1 is on Vc. √14,400 = 120 psi.
	s := shearCase{fc: 14400, lambda: 0.75, bw: 14, h: 20, d: 17, as: 2, fyt: 60000, bent: bentShare{single: 1e6}}
	_, v := s.evaluate(&us19)
	require.InEpsilon(t, 3*120*238, v.bent, 1e-12)
	// Several single groups share one limit; a series is not limited so.
	require.Equal(t, bentShare{5, 7}, bentShare{2, 3}.add(bentShare{3, 4}))
}

// A series carries Av fy (sin α + cos α) d/s if every line of 9.7.6.2.3 crosses
// the middle three quarters of a slope: 3/8 of its height, times 1 + cot α.
func TestSeriesOfBentGroups(t *testing.T) {
	g := bentGroup{area: 0.79, fy: 60000, slope: slopeOf(45), height: 16, spacing: 12, series: true}
	require.InEpsilon(t, 12, g.most(17, false), 1e-12) // min(6, 8.5) × 2
	require.InEpsilon(t, 6, g.most(17, true), 1e-12)
	require.InEpsilon(t, 10, g.most(10, false), 1e-12) // min(6, 5) × 2
	require.InEpsilon(t, 6, g.reach(), 1e-12)
	require.InEpsilon(t, 0.79*60000*math.Sqrt2/12, g.share(17).perDepth, 1e-12)
	require.Zero(t, g.share(17).single)
	g.spacing = 12.001
	require.Equal(t, bentShare{}, g.share(17))
	g.slope, g.spacing = slopeOf(60), 6
	require.InEpsilon(t, 6*(1+1/math.Sqrt(3)), g.most(17, false), 1e-12)
	require.InEpsilon(t, 6/math.Sqrt(3), g.reach(), 1e-12)
	require.InEpsilon(t, 0.79*60000*(0.5+math.Sqrt(3)/2)/6, g.share(17).perDepth, 1e-12)
	g.slope = slopeOf(29)
	require.Equal(t, bentShare{}, g.share(17), "too flat")
}

// Bent bars count only under the shear that they rise against, and only where
// the section cuts the middle of their slope.
func TestBentBarsCountWhereTheyCross(t *testing.T) {
	const reach = 3.0 / 8 * 19.25
	single := 0.79 * 60000 * math.Sqrt2 / 2
	for _, k := range []struct {
		name string
		bars beam.BentBars
		at   float64 // of the section, in.
		want float64 // Vs of bent bars by their rise: left
		also float64 // right
	}{
		{"at mid-slope", beam.BentBars{Bar: "#8", Count: 1, At: in(40), Angle: 45, Rises: "left"}, 40, single, 0},
		{"rising right", beam.BentBars{Bar: "#8", Count: 1, At: in(40), Angle: 45, Rises: "right"}, 40, 0, single},
		{"two bars", beam.BentBars{Bar: "#8", Count: 2, At: in(40), Angle: 45, Rises: "left"}, 40, 2 * single, 0},
		{"just inside, left", beam.BentBars{Bar: "#8", Count: 1, At: in(40), Angle: 45, Rises: "left"}, 40 - reach + 1e-3, single, 0},
		{"just outside, left", beam.BentBars{Bar: "#8", Count: 1, At: in(40), Angle: 45, Rises: "left"}, 40 - reach - 1e-3, 0, 0},
		{"just inside, right", beam.BentBars{Bar: "#8", Count: 1, At: in(40), Angle: 45, Rises: "left"}, 40 + reach - 1e-3, single, 0},
		{"just outside, right", beam.BentBars{Bar: "#8", Count: 1, At: in(40), Angle: 45, Rises: "left"}, 40 + reach + 1e-3, 0, 0},
		{"another span", beam.BentBars{Bar: "#8", Count: 1, At: in(40), Angle: 45, Rises: "left", Span: 2}, 40, 0, 0},
		{"series, beyond its last group", beam.BentBars{Bar: "#8", Count: 1, At: in(40), Angle: 45, Rises: "left", Bends: 3, Spacing: in(12)}, 64 + reach + 1e-3, 0, 0},
		{"upright bars have no reach", beam.BentBars{Bar: "#8", Count: 1, At: in(40), Angle: 90, Rises: "left"}, 40, 0, 0},
	} {
		t.Run(k.name, func(t *testing.T) {
			tr := bentTrial(t, ACI31819())
			span := k.bars.Span
			bend(t, tr, k.bars)
			if span > 0 {
				tr.Bent[0].Span = span
			}
			share := us19.bentAt(tr, 1, in(k.at))
			require.InDelta(t, k.want, share[risesLeft].single, 1e-6)
			require.InDelta(t, k.also, share[risesRight].single, 1e-6)
		})
	}
	// Between the first and the last group of a series every section counts.
	tr := bentTrial(t, ACI31819(), beam.BentBars{Bar: "#8", Count: 1, At: in(40), Angle: 45, Rises: "right", Bends: 3, Spacing: in(12)})
	share := us19.bentAt(tr, 1, in(64+reach-1e-3))
	require.InEpsilon(t, 0.79*60000*math.Sqrt2/12, share[risesRight].perDepth, 1e-12)
	require.Zero(t, share[risesLeft].perDepth)
	// Positive shear, that of the left end, is met by bars that rise to the left.
	require.Equal(t, risesLeft, against(units.Kip.Of(1)))
	require.Equal(t, risesRight, against(units.Kip.Of(-1)))
	require.InEpsilon(t, ownShear(40), tr.Forces.Action(1, 1, in(40), true).Shear.In(units.Kip), 1e-9)
}

// In a beam: 2 No. 8 bent up towards the left support carry shear there and
// nowhere else; towards the right, or at the other end, they do not.
func TestBentBarsInABeam(t *testing.T) {
	worst := func(e *edition, bars ...beam.BentBars) (at float64, c beam.Check) {
		tr := bentTrial(t, Code{e}, bars...)
		checks := e.judgeShearing(nil, tr)
		for i := range checks {
			if len(checks[i].Steps) > 0 {
				requireEvaluable(t, &checks[i])
			}
		}
		c = only(t, checks, "shear.strength")
		return c.At.In(units.Inch), c
	}
	plainVn := 2*math.Sqrt(4000)*14*21.625 + 0.22*60000*21.625/10
	for _, e := range []*edition{&us19, &us14} {
		left := beam.BentBars{Bar: "#8", Count: 2, At: in(30), Angle: 45, Rises: "left"}
		// 27.625 in. lies within 30 ± 7.22 in.: the right end is the worst now.
		at, c := worst(e, left)
		require.InEpsilon(t, 236.375, at, 1e-9)
		require.InEpsilon(t, 0.75*plainVn, valueIn(t, c.Capacity, "lb"), 1e-9)
		// With both ends helped the worst is where the left bars end, 37.21875 in.
		right := beam.BentBars{Bar: "#8", Count: 2, At: in(230), Angle: 45, Rises: "right"}
		at, c = worst(e, left, right)
		require.InEpsilon(t, 0.75*plainVn, valueIn(t, c.Capacity, "lb"), 1e-9)
		require.InEpsilon(t, ownShear(30+3.0/8*19.25), valueIn(t, c.Demand, "kip"), 1e-9)
		require.InEpsilon(t, 30+3.0/8*19.25, at, 1e-9)
		// Bent the wrong way they are no help at all.
		left.Rises, right.Rises = "right", "left"
		_, c = worst(e, left, right)
		require.InEpsilon(t, ownShear(27.625), valueIn(t, c.Demand, "kip"), 1e-9)
		require.InEpsilon(t, 0.75*plainVn, valueIn(t, c.Capacity, "lb"), 1e-9)
	}
	// A series over the whole left half and one over the right: the worst section
	// is the critical one again, with the series' share, d × Av fy √2 / 12.
	left := beam.BentBars{Bar: "#5", Count: 1, At: in(24), Angle: 45, Rises: "left", Bends: 9, Spacing: in(12)}
	right := beam.BentBars{Bar: "#5", Count: 1, At: in(144), Angle: 45, Rises: "right", Bends: 9, Spacing: in(12)}
	_, c := worst(&us19, left, right)
	require.InEpsilon(t, ownShear(27.625), valueIn(t, c.Demand, "kip"), 1e-9)
	require.InEpsilon(t, 0.75*(plainVn+0.31*60000*math.Sqrt2*21.625/12), valueIn(t, c.Capacity, "lb"), 1e-9)
	var symbols []string
	for _, s := range c.Steps {
		symbols = append(symbols, s.Symbol)
	}
	require.Subset(t, symbols, []string{"Ab,1", "fb,1", "sinα,1", "cosα,1", "sb,1", "Vb,1", "Vb", "Vs", "Vn"})
}

// Bent bars are no least stirrups: where they alone stand, 9.6.3.1 fails and Vc
// is by row (c).
func TestBentBarsAreNoLeastStirrups(t *testing.T) {
	tr := shearTrial(t, ACI31819(), nil)
	tr.Record = true
	bend(t, tr, beam.BentBars{Bar: "#8", Count: 2, At: in(24), Angle: 45, Rises: "left", Bends: 9, Spacing: in(12)})
	bend(t, tr, beam.BentBars{Bar: "#8", Count: 2, At: in(144), Angle: 45, Rises: "right", Bends: 9, Spacing: in(12)})
	checks := us19.judgeShearing(nil, tr)
	require.Equal(t, beam.Fail, only(t, checks, "shear.minimum-stirrups").Outcome)
	c := only(t, checks, "shear.strength")
	row := 8 * math.Sqrt(2/(1+2.1625)) * math.Cbrt(3.95/(14*21.625)) * math.Sqrt(4000) * 14 * 21.625
	require.InEpsilon(t, 0.75*(row+1.58*60000*math.Sqrt2*21.625/12), valueIn(t, c.Capacity, "lb"), 1e-9)
	requireEvaluable(t, &c)
}

// The bars themselves: at least 30 degrees, and series close enough, half as
// far where the required Vs is heavy.
func TestBentBarsThemselves(t *testing.T) {
	for _, k := range []struct {
		name    string
		bars    beam.BentBars
		live    float64 // kip/ft
		angle   beam.Outcome
		spacing beam.Outcome // zero: not asked
		most    float64      // in.
	}{
		{"single", beam.BentBars{Angle: 30}, 2.3, beam.Pass, 0, 0},
		{"too flat", beam.BentBars{Angle: 29.9}, 2.3, beam.Fail, 0, 0},
		// The slope of a No. 6 is 24 - 3.75 - 0.75 = 19.5 in.; 3/8 × 19.5 × 2 = 14.625 in.
		{"series", beam.BentBars{Angle: 45, Bends: 2, Spacing: in(14.625)}, 2.3, beam.Pass, beam.Pass, 14.625},
		{"series too wide", beam.BentBars{Angle: 45, Bends: 2, Spacing: in(14.63)}, 2.3, beam.Pass, beam.Fail, 14.625},
		{"heavy", beam.BentBars{Angle: 45, Bends: 2, Spacing: in(7.4)}, 12, beam.Pass, beam.Fail, 7.3125},
	} {
		t.Run(k.name, func(t *testing.T) {
			tr := shearTrial(t, ACI31814(), func(b *beam.Brief) { b.Loads[1].Intensity = units.KipPerFoot.Of(k.live) })
			tr.Record = true
			addZone(tr, 2, 10, 6, 258)
			k.bars.Bar, k.bars.Count, k.bars.At, k.bars.Rises = "#6", 2, in(30), "left"
			bend(t, tr, k.bars)
			checks := us14.judgeShearing(nil, tr)
			c := only(t, checks, "shear.bent-angle")
			require.Equal(t, k.angle, c.Outcome)
			require.Equal(t, "22.5.10.6.1", c.Clause)
			require.InEpsilon(t, 30, c.At.In(units.Inch), 1e-12)
			if k.spacing == 0 {
				require.Empty(t, checksOf(checks, "shear.bent-spacing"))
				return
			}
			c = only(t, checks, "shear.bent-spacing")
			require.Equal(t, k.spacing, c.Outcome)
			require.InEpsilon(t, k.most, valueIn(t, c.Capacity, "in"), 1e-9)
			requireEvaluable(t, &c)
		})
	}
}

// Bars above 60 ksi count with 60 ksi.
func TestBentBarsYieldIsCapped(t *testing.T) {
	for _, k := range []struct {
		yield, counts float64
		capped        bool
	}{{60, 60000, false}, {80, 60000, true}, {50, 50000, false}} {
		tr := shearTrial(t, ACI31819(), func(b *beam.Brief) { b.Reinforcement.Yield = units.KSI.Of(k.yield) })
		bend(t, tr, beam.BentBars{Bar: "#8", Count: 3, At: in(30), Angle: 45, Rises: "left"})
		g := us19.bentGroup(tr, 0)
		require.InEpsilon(t, k.counts, g.fy, 1e-12)
		require.Equal(t, k.capped, g.fyCapped)
		require.InEpsilon(t, 2.37, g.area, 1e-12)
		require.InEpsilon(t, 19.25, g.height, 1e-12)
		// d is the lesser of the two senses': 21.625 and 21.75 in.
		require.InEpsilon(t, 21.625, us19.bentDepth(tr), 1e-12)
		tr.Bottom.Count = 0
		require.InEpsilon(t, 21.75, us19.bentDepth(tr), 1e-12)
	}
}
