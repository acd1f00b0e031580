package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// The beam of these tests: 14 by 24 in., 4000 psi, 264 in. between centres of
// 12 in. supports, w = 1.2 (1.1 + 0.35) + 1.6 × 2.3 = 5.42 kip/ft with its own
// weight of 150 lb/ft3 × 14 × 24 / 144 = 0.35 kip/ft.
const ownLoad = 5.42

// shearTrial is that beam with 5 No. 8 bars at the bottom, 2 No. 6 at the top
// and No. 3 stirrups: d = 24 - 1.5 - 0.375 - 0.5 = 21.625 in.
func shearTrial(t testing.TB, c Code, edit func(*beam.Brief)) *beam.Trial {
	t.Helper()
	b := usBrief()
	if edit != nil {
		edit(&b)
	}
	return trialOf(t, problemOf(t, c, b), "#3", []group{{5, "#8"}}, []group{{2, "#6"}})
}

// ownShear is the shear of that beam in kip, x in. from the left centre.
func ownShear(x float64) float64 { return ownLoad * (11 - x/12) }

func TestShearAtDepthFromTheFace(t *testing.T) {
	for _, c := range []Code{ACI31814(), ACI31819()} {
		tr := shearTrial(t, c, nil)
		addZone(tr, 2, 10, 6, 258)
		got := only(t, c.e.judgeShearing(nil, tr), "shear.strength")
		// Own calculation: Vu at 6 + 21.625 in.; φVn = 0.75 (2√4000 × 14 × 21.625 + 0.22 × 60,000 × 21.625/10).
		require.InEpsilon(t, ownShear(27.625), valueIn(t, got.Demand, "kip"), 1e-9)
		require.InEpsilon(t, 0.75*(2*math.Sqrt(4000)*14*21.625+0.22*60000*21.625/10), valueIn(t, got.Capacity, "lb"), 1e-9)
		require.InEpsilon(t, 27.625, got.At.In(units.Inch), 1e-9)
		require.Equal(t, "1.2D + 1.6L", got.Combination)
		require.Equal(t, noteAtDepth, got.Reason)
	}
}

// 9.4.3.2: the shear at d may be used only if the reaction compresses the end
// region, loads act at or near the top, and no concentrated load acts between
// face and d.
func TestWhenShearAtDepthMayNotBeUsed(t *testing.T) {
	e := &us19
	load := func(l beam.Load) func(*beam.Trial) {
		return func(tr *beam.Trial) { tr.Brief.Loads = append(tr.Brief.Loads, l) }
	}
	point := func(at float64) beam.Load {
		return beam.Load{Case: beam.Dead, Shape: beam.PointLoad, Force: units.Kip.Of(1), At: units.Inch.Of(at)}
	}
	for _, c := range []struct {
		name  string
		edit  func(*beam.Trial)
		left  float64 // of the critical section, in. from the left centre
		right float64
		note  string // of the left end
	}{
		{"as built", func(*beam.Trial) {}, 27.625, 236.375, noteAtDepth},
		{"left support hung", func(tr *beam.Trial) { tr.Brief.Supports[0].Hung = true }, 6, 236.375, noteHungSupport},
		{"right support hung", func(tr *beam.Trial) { tr.Brief.Supports[1].Hung = true }, 27.625, 258, noteAtDepth},
		{"hung load", load(beam.Load{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1), Hung: true}), 6, 258, noteHungLoad},
		{"point load within d", load(point(20)), 6, 236.375, noteLoadInDepth},
		{"point load at d", load(point(27.625)), 6, 236.375, noteLoadInDepth},
		{"point load beyond d", load(point(27.626)), 27.625, 236.375, noteAtDepth},
		{"point load over the support", load(point(6)), 27.625, 236.375, noteAtDepth},
		{"point load near the right support", load(point(240)), 27.625, 258, noteAtDepth},
		{"couple within d", load(beam.Load{Case: beam.Dead, Shape: beam.Couple, Moment: units.KipFoot.Of(5), At: units.Inch.Of(20)}), 6, 236.375, noteLoadInDepth},
		{"point load on another span", load(beam.Load{Case: beam.Dead, Shape: beam.PointLoad, Span: 2, Force: units.Kip.Of(1), At: units.Inch.Of(20)}), 27.625, 236.375, noteAtDepth},
		{"point load of nothing", load(beam.Load{Case: beam.Dead, Shape: beam.PointLoad, At: units.Inch.Of(20)}), 27.625, 236.375, noteAtDepth},
		{"no tension steel", func(tr *beam.Trial) { tr.Bottom.Count = 0 }, 6, 258, noteNoSteel},
	} {
		t.Run(c.name, func(t *testing.T) {
			tr := shearTrial(t, Code{e}, nil)
			c.edit(tr)
			ends := shearEnds(tr, 1)
			require.InEpsilon(t, c.left, ends[0].critical.In(units.Inch), 1e-9)
			require.InEpsilon(t, c.right, ends[1].critical.In(units.Inch), 1e-9)
			require.Equal(t, c.note, ends[0].note)
		})
	}
}

// Where the face governs, the check says so and takes the shear there.
func TestHungSupportIsJudgedAtItsFace(t *testing.T) {
	tr := shearTrial(t, ACI31819(), func(b *beam.Brief) { b.Supports[1].Hung = true })
	addZone(tr, 2, 8, 6, 258)
	got := only(t, us19.judgeShearing(nil, tr), "shear.strength")
	require.InEpsilon(t, ownShear(6), valueIn(t, got.Demand, "kip"), 1e-9)
	require.InEpsilon(t, 258, got.At.In(units.Inch), 1e-9)
	require.Equal(t, noteHungSupport, got.Reason)
}

// Under uplift the reaction pulls: only that combination loses the shear at d.
func TestUpliftIsJudgedAtTheFace(t *testing.T) {
	tr := shearTrial(t, ACI31819(), func(b *beam.Brief) { b.Loads[1].Intensity = units.KipPerFoot.Of(-8) })
	addZone(tr, 2, 6, 6, 258)
	got := only(t, us19.judgeShearing(nil, tr), "shear.strength")
	// 1.2 (1.1 + 0.35) - 1.6 × 8 = -11.06 kip/ft, at the face.
	require.InEpsilon(t, 11.06*(11-0.5), valueIn(t, got.Demand, "kip"), 1e-9)
	require.Equal(t, "1.2D + 1.6L", got.Combination)
	require.Equal(t, notePulled, got.Reason)
}

// A cantilever's free end takes no support: d counts from the fixed end only,
// and is that of the top steel.
func TestCantilever(t *testing.T) {
	tr := shearTrial(t, ACI31819(), func(b *beam.Brief) {
		b.Spans = []units.Length{units.Foot.Of(8)}
		b.Supports = []beam.Support{{Kind: statics.Fixed}, {Kind: statics.Free}}
	})
	addZone(tr, 2, 10, 0, 96)
	ends := shearEnds(tr, 1)
	require.InEpsilon(t, 24-1.5-0.375-0.375, ends[0].critical.In(units.Inch), 1e-9)
	require.Equal(t, noteFreeEnd, ends[1].note)
	got := only(t, us19.judgeShearing(nil, tr), "shear.strength")
	require.InEpsilon(t, ownLoad*(8-21.75/12), valueIn(t, got.Demand, "kip"), 1e-9)
	// ρw and d are those of the top steel: 2 No. 6, 0.88 in2.
	require.InEpsilon(t, 0.75*(2*math.Sqrt(4000)*14*21.75+0.22*60000*21.75/10), valueIn(t, got.Capacity, "lb"), 1e-9)
}

// Every length between the faces that no zone reaches is judged as a section
// without stirrups; none is passed over.
func TestGapsBetweenZonesAreJudged(t *testing.T) {
	c := ACI31819()
	whole := func(tr *beam.Trial) { addZone(tr, 2, 10, 6, 258) }
	for _, k := range []struct {
		name string
		lay  func(*beam.Trial)
		gaps [][2]float64 // in.
	}{
		{"covered", whole, nil},
		{"covered, beyond the faces", func(tr *beam.Trial) { addZone(tr, 2, 10, 0, 264) }, nil},
		{"three zones that touch", func(tr *beam.Trial) {
			addZone(tr, 2, 10, 6, 56)
			addZone(tr, 2, 10, 56, 206)
			addZone(tr, 2, 10, 206, 258)
		}, nil},
		{"no zones", func(*beam.Trial) {}, [][2]float64{{6, 258}}},
		{"begins late", func(tr *beam.Trial) { addZone(tr, 2, 10, 14, 258) }, [][2]float64{{6, 14}}},
		{"first stirrup within a spacing of the face", func(tr *beam.Trial) { addZone(tr, 2, 10, 11, 258) }, nil},
		{"two spacings left out", func(tr *beam.Trial) {
			addZone(tr, 2, 10, 6, 96)
			addZone(tr, 2, 10, 106.1, 258)
		}, [][2]float64{{96, 106.1}}},
		{"ends early", func(tr *beam.Trial) { addZone(tr, 2, 10, 6, 250) }, [][2]float64{{250, 258}}},
		{"middle left out", func(tr *beam.Trial) {
			addZone(tr, 2, 10, 6, 96)
			addZone(tr, 2, 10, 168, 258)
		}, [][2]float64{{96, 168}}},
		{"two gaps, zones out of order", func(tr *beam.Trial) {
			addZone(tr, 2, 10, 206, 258)
			addZone(tr, 2, 10, 100, 150)
			addZone(tr, 2, 10, 6, 56)
		}, [][2]float64{{56, 100}, {150, 206}}},
		{"too few stirrups for the length", func(tr *beam.Trial) {
			whole(tr)
			tr.Zones[0].Count = 20
		}, [][2]float64{{206, 258}}},
		{"zone of another span", func(tr *beam.Trial) {
			whole(tr)
			tr.Zones[0].Span = 2
		}, [][2]float64{{6, 258}}},
		{"zone without stirrups", func(tr *beam.Trial) {
			whole(tr)
			tr.Zones[0].Count = 0
		}, [][2]float64{{6, 258}}},
		{"zone inside a support", func(tr *beam.Trial) {
			addZone(tr, 2, 10, 0, 6)
			addZone(tr, 2, 10, 6, 258)
		}, nil},
		{"a gap of rounding is none", func(tr *beam.Trial) {
			addZone(tr, 2, 10, 6, 56)
			addZone(tr, 2, 10, 56.0000000001, 258)
		}, nil},
	} {
		t.Run(k.name, func(t *testing.T) {
			tr := shearTrial(t, c, nil)
			k.lay(tr)
			checks := c.e.judgeShearing(nil, tr)
			var gaps []beam.Check
			for _, s := range checksOf(checks, "shear.minimum-stirrups") {
				if s.Reason == noteGap || s.Reason == noteNoStirrups {
					gaps = append(gaps, s)
				}
			}
			require.Len(t, gaps, len(k.gaps))
			for i, g := range k.gaps {
				// The worst section of the gap is its end further from midspan,
				// but no nearer the face than d.
				x := g[0]
				if math.Abs(132-g[1]) > math.Abs(132-g[0]) {
					x = g[1]
				}
				x = min(max(x, 27.625), 236.375)
				require.InEpsilon(t, math.Abs(ownShear(x)), valueIn(t, gaps[i].Demand, "kip"), 1e-9)
				// φλ√f'c bw d, and φVc by row (c) with 5 No. 8.
				require.InEpsilon(t, 0.75*math.Sqrt(4000)*14*21.625, valueIn(t, gaps[i].Capacity, "lb"), 1e-9)
			}
		})
	}
}

// A short gap between zones is a wider spacing, no more: what counts is how far
// the stirrups on either side are apart.
func TestShortGapIsAWiderSpacing(t *testing.T) {
	tr := shearTrial(t, ACI31819(), nil)
	addZone(tr, 2, 10, 6, 96)
	addZone(tr, 2, 10, 96.5, 258)
	checks := checksOf(us19.judgeShearing(nil, tr), "shear.strength")
	require.Len(t, checks, 3)
	require.Equal(t, noteBetween, checks[2].Reason)
	require.Equal(t, beam.Pass, checks[2].Outcome)
	// 2√f'c bw d and two legs of No. 4 or as laid, 10.5 in. apart.
	legs := tr.ZoneBar[0].Area.Scale(2).In(units.SquareInch)
	require.InEpsilon(t, 0.75*(2*math.Sqrt(4000)*14*21.625+legs*60000*21.625/10.5), valueIn(t, checks[2].Capacity, "lb"), 1e-9)

	// Beside a closer zone too, the stirrups are as far apart as they stand:
	// 3 + 1 + 5 in.
	tr = shearTrial(t, ACI31819(), nil)
	addZone(tr, 2, 6, 6, 96)
	addZone(tr, 2, 10, 97, 258)
	checks = checksOf(us19.judgeShearing(nil, tr), "shear.strength")
	require.Len(t, checks, 3)
	require.InEpsilon(t, 0.75*(2*math.Sqrt(4000)*14*21.625+legs*60000*21.625/9), valueIn(t, checks[2].Capacity, "lb"), 1e-9)
}

// Stirrups that are set so wide that they do not count bridge nothing: the
// sections on either side of them are judged with what is there, between zones
// and from the face (Table 9.7.6.2.2, 9.6.3.1).
func TestWideZonesBridgeNothing(t *testing.T) {
	tr := shearTrial(t, ACI31819(), nil)
	addZone(tr, 2, 270, 131.5, 132.5)
	checks := us19.judgeShearing(nil, tr)
	strength := checksOf(checks, "shear.strength")
	require.Len(t, strength, 3)
	require.Equal(t, beam.Fail, strength[1].Outcome, "from the left face")
	require.Equal(t, beam.Fail, strength[2].Outcome, "to the right face")

	tr = shearTrial(t, ACI31819(), nil)
	addZone(tr, 2, 4, 6, 86)
	addZone(tr, 2, 40, 104, 160)
	addZone(tr, 2, 4, 178, 258)
	failed := map[string]bool{}
	for _, c := range us19.judgeShearing(nil, tr) {
		failed[c.ID] = failed[c.ID] || c.Outcome == beam.Fail
	}
	require.True(t, failed["shear.spacing-along"])
	require.True(t, failed["shear.minimum-stirrups"])
}

// Between open and closed stirrups the open ones are what is there, and of two
// like ones those of less area.
func TestWeakerOfTwoZones(t *testing.T) {
	tr := shearTrial(t, ACI31819(), nil)
	addZone(tr, 4, 10, 6, 90)
	addZone(tr, 2, 10, 96, 258)
	s := newShearSpan(tr, 1)
	require.Equal(t, 1, s.weaker(0, 1))
	require.Equal(t, 1, s.weaker(1, 0))
	tr.Zones[0].Form = "open"
	require.Equal(t, 0, s.weaker(0, 1))
	require.Equal(t, 0, s.weaker(1, 0))
	tr.Zones[1].Form = "open"
	require.Equal(t, 1, s.weaker(0, 1))
}

// A gap beside the face stands for the sections up to d from it, and fails.
func TestGapAtTheFaceFails(t *testing.T) {
	tr := shearTrial(t, ACI31819(), nil)
	addZone(tr, 2, 10, 14, 258)
	checks := us19.judgeShearing(nil, tr)
	strength := checksOf(checks, "shear.strength")
	require.Len(t, strength, 2)
	require.Equal(t, beam.Pass, strength[0].Outcome)
	require.Equal(t, beam.Fail, strength[1].Outcome)
	require.Equal(t, noteGap, strength[1].Reason)
	row := 8 * math.Sqrt(2/(1+2.1625)) * math.Cbrt(3.95/(14*21.625)) * math.Sqrt(4000) * 14 * 21.625
	require.InEpsilon(t, 0.75*row, valueIn(t, strength[1].Capacity, "lb"), 1e-9)
}

// Where zones meet at a point load, both take the larger shear of the jump.
func TestZoneEndsTakeBothSidesOfAJump(t *testing.T) {
	tr := shearTrial(t, ACI31819(), func(b *beam.Brief) {
		b.Loads = []beam.Load{{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(50), At: units.Inch.Of(88)}}
		b.NoSelfWeight = true
	})
	addZone(tr, 2, 8, 6, 88)
	addZone(tr, 2, 10, 88, 258)
	got := checksOf(us19.judgeShearing(nil, tr), "shear.strength")
	require.Len(t, got, 2)
	// 1.6 × 50 = 80 kip: 53.33 kip left of the load, 26.67 kip right of it.
	require.InEpsilon(t, 80*2.0/3, valueIn(t, got[0].Demand, "kip"), 1e-9)
	require.InEpsilon(t, 80*2.0/3, valueIn(t, got[1].Demand, "kip"), 1e-9)
}

// The steel ratio and d are those of the face in tension at the section
// (not the bottom steel under a negative moment).
func TestSteelRatioFollowsTheSenseOfBending(t *testing.T) {
	for _, c := range []struct {
		moment float64
		d, as  float64
	}{{200, 21.625, 3.95}, {-200, 21.75, 0.88}} {
		p := problemOf(t, ACI31819(), demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(c.moment), Shear: units.Kip.Of(10)}))
		tr := trialOf(t, p, "#3", []group{{5, "#8"}}, []group{{2, "#6"}})
		got := only(t, us19.judgeShearing(nil, tr), "shear.strength")
		row := 8 * math.Sqrt(2/(1+c.d/10)) * math.Cbrt(c.as/(14*c.d)) * math.Sqrt(4000) * 14 * c.d
		require.InEpsilon(t, 0.75*row, valueIn(t, got.Capacity, "lb"), 1e-9)
	}
}

// A shear without a moment belongs to the sense that other demands bend; with
// none, to the weaker.
func TestDemandWithoutMoment(t *testing.T) {
	row := func(d, as float64) float64 {
		return 0.75 * 8 * math.Sqrt(2/(1+d/10)) * math.Cbrt(as/(14*d)) * math.Sqrt(4000) * 14 * d
	}
	shear := beam.Demand{Name: "V", Shear: units.Kip.Of(10)}
	for _, c := range []struct {
		demands []beam.Demand
		want    float64
	}{
		{[]beam.Demand{shear}, row(21.75, 0.88)},
		{[]beam.Demand{shear, {Name: "M", Moment: units.KipFoot.Of(100)}}, row(21.625, 3.95)},
	} {
		p := problemOf(t, ACI31819(), demandBrief(c.demands...))
		tr := trialOf(t, p, "#3", []group{{5, "#8"}}, []group{{2, "#6"}})
		got := only(t, us19.judgeShearing(nil, tr), "shear.strength")
		require.Equal(t, "V", got.Combination)
		require.InEpsilon(t, c.want, valueIn(t, got.Capacity, "lb"), 1e-9)
	}
}

// Without any shear there is nothing to judge; that is said.
func TestNoShear(t *testing.T) {
	p := problemOf(t, ACI31819(), demandBrief(beam.Demand{Name: "A"}))
	tr := trialOf(t, p, "#3", nil, nil)
	checks := us19.judgeShearing(nil, tr)
	require.Equal(t, beam.NotApplicable, only(t, checks, "shear.strength").Outcome)
	require.Equal(t, beam.NotApplicable, only(t, checks, "shear.section-limit").Outcome)
}

// Where only the size effect calls for stirrups, least stirrups are not asked
// for by 9.6.3.1, and that is said; spacing and strength are judged.
func TestStirrupsForStrengthOnly(t *testing.T) {
	b := demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(100), Shear: units.Kip.Of(17)})
	b.Section.Depth = units.Inch.Of(36)
	tr := trialOf(t, problemOf(t, ACI31819(), b), "#3", []group{{2, "#6"}}, []group{{2, "#6"}})
	addZone(tr, 2, 16.5, 0, 0)
	// Less than the least, so that row (c) counts.
	tr.ZoneBar[0] = bars.Size{Name: "thin", Diameter: units.Inch.Of(0.25), Area: units.SquareInch.Of(0.05)}
	checks := us19.judgeShearing(nil, tr)
	least := only(t, checks, "shear.minimum-stirrups")
	require.Equal(t, beam.NotApplicable, least.Outcome)
	require.Equal(t, noteForStrength, least.Reason)
	require.Equal(t, beam.Pass, only(t, checks, "shear.spacing-along").Outcome)
	require.Equal(t, beam.Pass, only(t, checks, "shear.strength").Outcome)
}

// Axial compression below 0.10 f'c Ag counts in Vc, each demand with its own.
func TestDemandsWithAxialForce(t *testing.T) {
	p := problemOf(t, ACI31819(), demandBrief(
		beam.Demand{Name: "A", Moment: units.KipFoot.Of(100), Shear: units.Kip.Of(30)},
		beam.Demand{Name: "B", Moment: units.KipFoot.Of(100), Shear: units.Kip.Of(31), Axial: units.Kip.Of(60)},
	))
	tr := trialOf(t, p, "#3", []group{{5, "#8"}}, []group{{2, "#6"}})
	addZone(tr, 2, 10, 0, 0)
	got := only(t, us19.judgeShearing(nil, tr), "shear.strength")
	require.Equal(t, "A", got.Combination, "the axial force carries more than the extra shear")
	require.InEpsilon(t, 0.75*(2*math.Sqrt(4000)*14*21.625+0.22*60000*21.625/10), valueIn(t, got.Capacity, "lb"), 1e-9)
}

// 318-19 judges the distance between legs, 318-14 does not.
func TestLegDistance(t *testing.T) {
	wide := func(b *beam.Brief) { b.Section.Width = units.Inch.Of(30) }
	for _, c := range []struct {
		code Code
		legs int
		want beam.Outcome
	}{{ACI31819(), 2, beam.Fail}, {ACI31819(), 3, beam.Pass}} {
		tr := shearTrial(t, c.code, wide)
		addZone(tr, c.legs, 6, 6, 258)
		got := only(t, c.code.e.judgeShearing(nil, tr), "shear.spacing-across")
		require.Equal(t, c.want, got.Outcome)
		require.InEpsilon(t, (30-3-0.375)/float64(c.legs-1), valueIn(t, got.Demand, "in"), 1e-9)
		require.InEpsilon(t, 21.625, valueIn(t, got.Capacity, "in"), 1e-9)
	}
	tr := shearTrial(t, ACI31814(), wide)
	addZone(tr, 2, 6, 6, 258)
	require.Empty(t, checksOf(us14.judgeShearing(nil, tr), "shear.spacing-across"))
}

// Each bend of more than two legs needs a bar at both faces (25.7.1.2).
func TestLegsNeedBars(t *testing.T) {
	tr := shearTrial(t, ACI31819(), nil)
	addZone(tr, 4, 10, 6, 258)
	got := only(t, us19.judgeShearing(nil, tr), "shear.leg-bars")
	require.Equal(t, beam.Fail, got.Outcome)
	tr = trialOf(t, tr.Problem, "#3", []group{{5, "#8"}}, []group{{4, "#6"}})
	addZone(tr, 4, 10, 6, 258)
	got = only(t, us19.judgeShearing(nil, tr), "shear.leg-bars")
	require.Equal(t, beam.Pass, got.Outcome)
}

// 25.7.1.3: No. 5 stirrups and smaller, and No. 6 to 8 of up to 40 ksi, need
// only their hook; stronger ones 0.014 db fyt/(λ√f'c) beyond mid-depth.
func TestAnchorageOfLargeStirrups(t *testing.T) {
	for _, c := range []struct {
		tie    string
		yield  float64
		depth  float64
		want   beam.Outcome
		demand float64
	}{
		{"#5", 60, 24, beam.NotApplicable, 0},
		{"#6", 40, 24, beam.NotApplicable, 0},
		{"#6", 60, 24, beam.Pass, 0.014 * 0.75 * 60000 / math.Sqrt(4000)}, // 9.96 in. of 24/2 - 1.5 = 10.5 in.
		{"#6", 80, 24, beam.Pass, 0.014 * 0.75 * 60000 / math.Sqrt(4000)}, // counted with 60 ksi
		{"#8", 60, 24, beam.Fail, 0.014 * 1.0 * 60000 / math.Sqrt(4000)},  // 13.28 in.
	} {
		b := usBrief()
		b.Reinforcement.StirrupYield = units.KSI.Of(c.yield)
		tr := trialOf(t, problemOf(t, ACI31819(), b), c.tie, []group{{3, "#8"}}, []group{{2, "#6"}})
		tr.Record = true
		addZone(tr, 2, 10, 6, 258)
		got := only(t, us19.judgeShearing(nil, tr), "shear.stirrup-anchorage")
		require.Equal(t, c.want, got.Outcome, "%s of %g ksi", c.tie, c.yield)
		if c.want != beam.NotApplicable {
			require.InEpsilon(t, c.demand, valueIn(t, got.Demand, "in"), 1e-9)
			require.InEpsilon(t, 10.5, valueIn(t, got.Capacity, "in"), 1e-9)
			requireEvaluable(t, &got)
		}
	}
}

// The detailed expression of 318-14 varies along the beam: the worst section
// need not be the one with the greatest shear. The stations are held against a
// fine sweep of the same clause.
func TestDetailedExpressionAlongTheBeam(t *testing.T) {
	tr := shearTrial(t, ACI31814(), func(b *beam.Brief) {
		b.Readings.ShearMethod = beam.DetailedShear
		b.Loads = []beam.Load{{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(30), At: units.Inch.Of(132)}}
		b.NoSelfWeight = true
	})
	addZone(tr, 2, 10, 6, 258)
	got := only(t, us14.judgeShearing(nil, tr), "shear.strength")
	// Shear is 24 kip throughout; Vc is least where Mu is greatest, at midspan:
	// Vu d/Mu = 21.625/132.
	rho := 3.95 / (14 * 21.625)
	vc := (1.9*math.Sqrt(4000) + 2500*rho*21.625/132) * 14 * 21.625
	require.InEpsilon(t, 0.75*(vc+0.22*60000*21.625/10), valueIn(t, got.Capacity, "lb"), 1e-9)
	require.InEpsilon(t, 132, got.At.In(units.Inch), 1e-9)
}

// sweep is the greatest utilization of the strength of a beam with one zone of
// stirrups over its length, by brute force over many sections.
func sweep(tr *beam.Trial, e *edition, n int) float64 {
	worst := 0.0
	ends := shearEnds(tr, 1)
	z := e.newWebZone(tr, 1, 0, tr.Zones[0].Spacing)
	for i := range tr.Forces.Combinations() {
		from, _ := ends[0].start(&tr.Forces, i, 1)
		to, _ := ends[1].start(&tr.Forces, i, 1)
		for k := 0; k <= n; k++ {
			x := from.Add(to.Sub(from).Scale(float64(k) / float64(n)))
			for _, right := range []bool{false, true} {
				a := tr.Forces.Action(i, 1, x, right)
				sense := beam.Positive
				if a.Moment.Less(units.Moment{}) {
					sense = beam.Negative
				}
				if a.Moment.IsZero() {
					continue
				}
				s := z.web[senseIndex(sense)].at(e, shearForces{shear: a.Shear, moment: a.Moment})
				worst = max(worst, ratio(s.shear, s.design))
			}
		}
	}
	return worst
}

// The extremes found are those of a sweep over 2000 sections, of random beams
// with both senses of bending, and never less.
func TestWorstSectionAgreesWithASweep(t *testing.T) {
	rapid.Check(t, func(r *rapid.T) {
		// A brief holds no value too small to be meant: draw thousandths.
		draw := func(least, most int, name string) float64 {
			return float64(rapid.IntRange(least, most).Draw(r, name)) / 1000
		}
		b := usBrief()
		span := draw(18_000, 30_000, "span")
		b.Spans = []units.Length{units.Foot.Of(span)}
		kinds := []statics.SupportKind{statics.Pinned, statics.Fixed}
		for i := range b.Supports {
			b.Supports[i].Kind = kinds[rapid.IntRange(0, 1).Draw(r, "kind")]
		}
		b.Loads = nil
		for range rapid.IntRange(1, 4).Draw(r, "loads") {
			from := draw(0, 600, "from")
			b.Loads = append(b.Loads, beam.Load{
				Case: beam.LoadCases()[rapid.IntRange(0, 6).Draw(r, "case")], Shape: beam.Partial,
				Intensity:    units.KipPerFoot.Of(draw(-2000, 3000, "w")),
				IntensityEnd: units.KipPerFoot.Of(draw(-2000, 3000, "w end")), Varies: true,
				From: units.Foot.Of(span * from), To: units.Foot.Of(span * (from + 0.4)),
			})
		}
		b.Loads = append(b.Loads, beam.Load{
			Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(draw(-10_000, 20_000, "p")),
			At: units.Foot.Of(span * draw(300, 700, "at")),
		})
		for _, c := range []Code{ACI31819(), ACI31814()} {
			if rapid.Bool().Draw(r, "detailed") {
				b.Readings.ShearMethod = beam.DetailedShear
			}
			tr := trialOf(t, problemOf(t, c, b), "#4", []group{{4, "#8"}}, []group{{2, "#10"}})
			addZone(tr, 2, 9, 0, span*12)
			checks := checksOf(c.e.judgeShearing(nil, tr), "shear.strength")
			require.Len(r, checks, 1)
			want := sweep(tr, c.e, 2000)
			got := checks[0].Utilization
			slack := 1e-9
			if b.Readings.ShearMethod == beam.DetailedShear && !c.e.shear.rowsByStirrups {
				slack = 0.01 // between stations
			}
			require.GreaterOrEqual(r, got, want*(1-slack))
			require.LessOrEqual(r, got, want*1.02+1e-9) // what the sweep misses between its sections
		}
	})
}

// A distributed load that is heavy between the face and d, though too long for a
// concentrated one, is not left out: the shear at the face governs.
func TestHeavyLoadNearTheFaceCountsInFull(t *testing.T) {
	near := func(to float64) *beam.Trial {
		tr := shearTrial(t, ACI31819(), func(b *beam.Brief) {
			b.NoSelfWeight = true
			b.Loads = []beam.Load{{Case: beam.Live, Shape: beam.Partial, Intensity: units.KipPerFoot.Of(6), From: units.Inch.Of(6), To: units.Inch.Of(to)}}
		})
		addZone(tr, 2, 10, 6, 258)
		return tr
	}
	// 1.6 × 6 kip/ft over 52 in. of 264: R = w c (1 - (6 + c/2)/264)
	c := only(t, us19.judgeShearing(nil, near(58)), "shear.strength")
	require.Equal(t, noteLoadInDepth, c.Reason)
	require.InEpsilon(t, 0.8*52*(1-32.0/264), valueIn(t, c.Demand, "kip"), 1e-9)
	// Over most of the span it is even enough for the shear at d; the right end
	// governs, where the last 14 in. are bare.
	c = only(t, us19.judgeShearing(nil, near(250)), "shear.strength")
	require.Equal(t, noteAtDepth, c.Reason)
	require.InEpsilon(t, 0.8*(244*128.0/264-(250-236.375)), valueIn(t, c.Demand, "kip"), 1e-9)
}
