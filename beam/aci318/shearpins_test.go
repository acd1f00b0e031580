package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// 25.7.1.3(a) up to Grade 40 (280), (b) above, from both sides, with 0.014 (0.17)
// db fyt/(λ√f'c).
func TestGradeThatAHookDevelops(t *testing.T) {
	for _, k := range []struct {
		code  Code
		b     beam.Brief
		bar   string
		full  units.Stress
		above units.Stress
		need  float64
	}{
		{ACI31814(), usBrief(), "#6", psi(40000), psi(40100), 0.014 * 0.75 * 40100 / math.Sqrt(4000)},
		{ACI31819(), usBrief(), "#6", psi(40000), psi(40100), 0.014 * 0.75 * 40100 / math.Sqrt(4000)},
		{ACI31814M(), siBrief(), "No. 19", mpa(280), mpa(281), 0.17 * 19.1 * 281 / math.Sqrt(30)},
		{ACI31819M(), siBrief(), "No. 19", mpa(280), mpa(281), 0.17 * 19.1 * 281 / math.Sqrt(30)},
	} {
		judge := func(yield units.Stress) beam.Check {
			tr := trialOf(t, problemOf(t, k.code, with(k.b, func(b *beam.Brief) { b.Reinforcement.StirrupYield = yield })), k.bar, nil, nil)
			tr.Zones, tr.ZoneBar = []beam.Zone{{Span: 1, Bar: k.bar, Legs: 2}}, append(tr.ZoneBar, tr.Stirrup)
			return only(t, k.code.e.judgeStirrups(nil, tr, 0, -1), "shear.stirrup-anchorage")
		}
		require.Equal(t, beam.NotApplicable, judge(k.full).Outcome)
		c := judge(k.above)
		require.NotEqual(t, beam.NotApplicable, c.Outcome)
		unit := map[units.System]string{units.US: "in", units.SI: "mm"}[k.code.e.system]
		require.InEpsilon(t, k.need, valueIn(t, c.Demand, unit), 1e-9)
	}
	tr := shearTrial(t, ACI31819(), func(b *beam.Brief) { b.Concrete.Strength = psi(10000) })
	require.False(t, us19.stirrupHook(tr, in(0.75)).capped, "at 100 psi the root is its own cap")
	require.Zero(t, outerBars(&beam.FaceSteel{}))
	require.Equal(t, 8, barNumber(in(1.06)))
}

// What has no size carries nothing, and is not divided by; a shade of an axial
// force counts as one.
func TestShearOfLittle(t *testing.T) {
	us := shearCase{fc: 4000, lambda: 1, bw: 12, h: 20, fyt: 60000}
	w, s := us.evaluate(&us19)
	require.Zero(t, w.bare.ratio)
	require.Equal(t, rowC, s.concrete.row)
	require.Zero(t, s.concrete.strength)
	us.nu = -100
	_, s = us.evaluate(&us14)
	require.Equal(t, rowTension, s.concrete.row)
	us.nu = 0.5
	us.d, us.as = 17.5, 2
	w, s = us.evaluate(&us14)
	require.Equal(t, rowCompression, s.concrete.row)
	steps := w.strengthSteps(&us14, &s, nil)
	require.Equal(t, "22.5.6.1", steps[len(steps)-2].Clause)
	tiny := shearCase{fc: 4000, lambda: 1, bw: 0.5, h: 2, d: 1, as: 0.01, fyt: 60000}
	w, _ = tiny.evaluate(&us19)
	require.InEpsilon(t, 0.02, w.bare.ratio, 1e-9)

	// Stirrups of no spacing, of no area, and very close ones.
	us.nu, us.av = 0, 0.22
	w, _ = us.evaluate(&us19)
	require.Zero(t, w.provided)
	us.av, us.s = 0, 40
	w, _ = us.evaluate(&us19)
	require.False(t, w.wide)
	us.av, us.s = 0.22, 0.5
	w, _ = us.evaluate(&us19)
	require.InEpsilon(t, 0.44, w.provided, 1e-9)
	require.Equal(t, slope{90, 1, 0}, slopeOf(90))
	require.Equal(t, slope{90, 1, 0}, slopeOf(0))

	// Vu d = Mu: row (a) of 318-14 is row (b) and is left out.
	us.method = beam.DetailedShear
	w, _ = us.evaluate(&us14)
	require.Zero(t, w.bare.concrete(&us14, 10, 10*w.bare.d, 0, false).a)
	require.NotZero(t, w.bare.concrete(&us14, 10, 10.01*w.bare.d, 0, false).a)

	// Halved spacings of deep metric webs end at 300 mm.
	deep := shearCase{fc: 30, lambda: 1, bw: 400, h: 1500, d: 1400, as: 4000, fyt: 420, av: 258, s: 100, vu: 2.4e6}
	for _, e := range []*edition{&si14, &si19} {
		_, s = deep.evaluate(e)
		require.True(t, s.heavy)
		require.Equal(t, 300.0, s.along)
	}

	require.Zero(t, ratio(0, 0))
	require.Equal(t, beam.NoCapacity, ratio(1, 0))
	require.Equal(t, beam.NoCapacity, ratio(1, 1e-12))
}

// Notes of workings that no layout within scope reaches, or not alone.
func TestNotesOfShearWorkings(t *testing.T) {
	notes := func(c shearCase, e *edition) (out []string) {
		w, s := c.evaluate(e)
		for _, x := range w.strengthSteps(e, &s, nil) {
			out = append(out, x.Note)
		}
		return out
	}
	us := shearCase{fc: 4000, lambda: 1, bw: 12, h: 20, d: 17.5, as: 2, fyt: 60000}
	capped := with(us, func(c *shearCase) { c.nu = 300000 })
	require.Contains(t, notes(capped, &us19), "capped")
	w, s := capped.evaluate(&us19)
	q := query()
	require.Contains(t, us19.shearStrength(&q, &w, &s).Notes, "the axial term is capped at 0.05 f'c (22.5.5.1.2)")
	flat := notes(with(us, func(c *shearCase) { c.av, c.s, c.angle = 0.22, 6, 40 }), &us14)
	require.Equal(t, noteFlat, flat[len(flat)-1])
	require.NotContains(t, notes(with(us, func(c *shearCase) { c.fc, c.av, c.s = 10000, 0.22, 4 }), &us14),
		"not capped: there are at least the least stirrups (22.5.3.2)")
}

// The greatest shear among demands, whichever its sign; of equals the first.
func TestGreatestDemand(t *testing.T) {
	trial := func(demands ...beam.Demand) *beam.Trial {
		return trialOf(t, problemOf(t, ACI31814(), demandBrief(demands...)), "#3", []group{{5, "#8"}}, []group{{2, "#6"}, {2, "#6"}})
	}
	shears := func(kips ...float64) units.Force {
		var d []beam.Demand
		for i, v := range kips {
			d = append(d, beam.Demand{Name: string(rune('A' + i)), Shear: units.Kip.Of(v)})
		}
		return greatestDemand(trial(d...))
	}
	require.Equal(t, units.Kip.Of(-30), shears(10, -30, 20))
	require.Equal(t, units.Kip.Of(20), shears(20, -20))
	require.Equal(t, units.Kip.Of(-20), shears(-20, 20))

	senses := func(tr *beam.Trial, moments ...float64) [2]bool {
		var d []beam.Demand
		for i, m := range moments {
			d = append(d, beam.Demand{Name: string(rune('A' + i)), Moment: units.NewtonMetre.Of(m)})
		}
		tr.Forces = trial(d...).Forces
		return demandSenses(tr)
	}
	tr := trial(beam.Demand{Name: "A"})
	require.Equal(t, [2]bool{true, false}, senses(tr, 0.5))
	require.Equal(t, [2]bool{false, true}, senses(tr, -0.5, 0))
	require.Equal(t, [2]bool{true, true}, senses(tr, -2, 5))
	tr.Bottom.Count, tr.Top.Count = 1, 0
	require.Equal(t, [2]bool{true, false}, senses(tr, 0))
	tr.Bottom.Count, tr.Top.Count = 0, 1
	require.Equal(t, [2]bool{false, true}, senses(tr, 0))

	// Stirrups lean against the greatest shear: here the negative one, so that
	// the positive ones find none, and the top bars' lesser d lets the lesser
	// shear ask for stirrups first.
	tr = trial(beam.Demand{Name: "A", Moment: units.KipFoot.Of(100), Shear: units.Kip.Of(-40)},
		beam.Demand{Name: "B", Moment: units.KipFoot.Of(-50), Shear: units.Kip.Of(39.9)})
	addZone(tr, 2, 8, 0, 0)
	tr.Zones[0].Angle = 60
	c := only(t, us14.judgeShearing(nil, tr), "shear.minimum-stirrups")
	require.Equal(t, noteWayward, c.Reason)
	require.Equal(t, "B", c.Combination)
	require.Equal(t, beam.Fail, c.Outcome)

	// At the shear that calls for stirrups itself none are required.
	tr = trial(beam.Demand{Name: "A", Moment: units.KipFoot.Of(100), Shear: units.PoundForce.Of(0.75 * math.Sqrt(4000) * 14 * 21.625)})
	addZone(tr, 2, 8, 0, 0)
	require.Equal(t, beam.NotApplicable, only(t, us19.judgeShearing(nil, tr), "shear.minimum-stirrups").Outcome)

	// Like stirrups are judged once; the section limit is that of the weaker web.
	tr = trial(beam.Demand{Name: "A", Moment: units.KipFoot.Of(100), Shear: units.Kip.Of(30)})
	addZone(tr, 2, 8, 0, 0)
	addZone(tr, 2, 40, 0, 0)
	checks := us19.judgeShearing(nil, tr)
	require.Len(t, checksOf(checks, "shear.stirrup-size"), 1)
	row := 8 * math.Sqrt(2/(1+2.1625)) * math.Cbrt(3.95/(14*21.625))
	require.InEpsilon(t, 0.75*(row+8)*math.Sqrt(4000)*14*21.625, valueIn(t, only(t, checks, "shear.section-limit").Capacity, "lb"), 1e-9)
}

// Zones in any order, and what is none.
func TestZonesAndGapsInAnyOrder(t *testing.T) {
	tr := shearTrial(t, ACI31819(), nil)
	addZone(tr, 2, 10, 106, 254)
	addZone(tr, 2, 10, 6, 96)
	s := newShearSpan(tr, 1)
	require.InEpsilon(t, 264e-9, s.slip.In(units.Inch), 1e-9)
	require.False(t, s.clearlyLess(units.Length{}, s.slip))
	require.True(t, s.clearlyLess(units.Length{}, s.slip.Scale(1.01)))
	for range 2 { // apart by two spacings of 10 in. exactly
		checks := checksOf(us19.judgeShearing(nil, tr), "shear.strength")
		require.Len(t, checks, 4)
		require.Equal(t, noteBetween, checks[2].Reason)
		require.Equal(t, noteAtDepth, checks[3].Reason, "to the right face the zone goes on")
		tr.Zones[0], tr.Zones[1] = tr.Zones[1], tr.Zones[0]
	}
	require.Equal(t, 0, s.weaker(0, 1))
	require.Equal(t, 1, s.weaker(1, 0), "of like ones the first")
	for _, edit := range []func(z *beam.Zone){
		func(z *beam.Zone) { z.Legs = 0 }, func(z *beam.Zone) { z.Count = 0 }, func(z *beam.Zone) { z.Spacing = units.Length{} }, func(z *beam.Zone) { z.Span = 2 },
	} {
		tr.Zones[0] = with(tr.Zones[1], edit)
		require.False(t, s.stirrups(0))
	}
	tr.Zones[0] = with(tr.Zones[1], func(z *beam.Zone) { z.Legs, z.Count = 1, 1 })
	require.True(t, s.stirrups(0))

	// A zone inside a support is none of the span's.
	tr = shearTrial(t, ACI31819(), nil)
	addZone(tr, 2, 10, 0, 6)
	addZone(tr, 2, 10, 6, 258)
	require.Len(t, checksOf(us19.judgeShearing(nil, tr), "shear.strength"), 1)

	// Where the critical sections of both ends pass each other all of the length
	// between the faces takes its own shear.
	tr = shearTrial(t, ACI31819(), nil)
	tr.Brief.Supports[0].Width, tr.Brief.Supports[1].Width = in(240), in(240)
	addZone(tr, 2, 10, 0, 264)
	require.InEpsilon(t, ownShear(120), valueIn(t, only(t, us19.judgeShearing(nil, tr), "shear.strength").Demand, "kip"), 1e-9)
}

// The greatest shear between two places, at a load inside them too: 1.6 × 50 kip
// down at 88 in. and up at 176 in. leave a third of it outside and two thirds
// between.
func TestGreatestShearBetweenPlaces(t *testing.T) {
	point := func(kips, at float64) beam.Load {
		return beam.Load{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(kips), At: in(at)}
	}
	greatest := func(from, to float64, loads ...beam.Load) float64 {
		tr := shearTrial(t, ACI31819(), func(b *beam.Brief) { b.Loads, b.NoSelfWeight = loads, true })
		s := newShearSpan(tr, 1)
		return s.greatest(tr.Forces.Breaks(nil, 1), in(from), in(to)).In(units.Kip)
	}
	require.InEpsilon(t, -80*2.0/3, greatest(60, 200, point(50, 88), point(-50, 176)), 1e-9)
	require.InEpsilon(t, 80.0/3, greatest(60, 80, point(50, 88), point(-50, 176)), 1e-9)
	require.InEpsilon(t, 40, greatest(60, 200, point(50, 132)), 1e-9, "of equals the first")

	// A load that turns its sign leaves its greatest shear inside the span, where
	// it is zero: 4 to -4 kip/ft, V = 4 × 22/6 - 4 × 11/2 at midspan.
	tr := shearTrial(t, ACI31819(), func(b *beam.Brief) {
		b.NoSelfWeight = true
		b.Loads = []beam.Load{{Case: beam.Live, Shape: beam.Partial, Varies: true, Intensity: units.KipPerFoot.Of(4), IntensityEnd: units.KipPerFoot.Of(-4), To: in(264)}}
	})
	addZone(tr, 2, 10, 6, 100)
	addZone(tr, 2, 10, 100, 164)
	addZone(tr, 2, 10, 164, 258)
	c := checksOf(us19.judgeShearing(nil, tr), "shear.strength")[1]
	require.InEpsilon(t, 1.6*(22-44.0/3), valueIn(t, c.Demand, "kip"), 1e-9)
	require.InEpsilon(t, 132, c.At.In(units.Inch), 1e-6)
}

// Beyond the last load of a cantilever nothing acts; what stands there is judged
// in the sense that the cantilever is bent.
func TestBeyondTheLastLoad(t *testing.T) {
	for _, kips := range []float64{10, -10} {
		tr := shearTrial(t, ACI31819(), func(b *beam.Brief) {
			b.Spans, b.NoSelfWeight = []units.Length{units.Foot.Of(12)}, true
			b.Supports = []beam.Support{{Kind: statics.Fixed}, {Kind: statics.Free}}
			b.Loads = []beam.Load{{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(kips), At: in(90)}}
		})
		addZone(tr, 2, 10, 0, 100)
		addZone(tr, 2, 10, 100, 144)
		c := checksOf(us19.judgeShearing(nil, tr), "shear.strength")[1]
		require.Equal(t, beam.Pass, c.Outcome)
		require.Zero(t, c.Demand.SI())
	}
}

// What loads of which span and shape decide of the critical sections.
func TestLoadsThatDecideTheCriticalSection(t *testing.T) {
	brief := func(l beam.Load) *beam.Brief { return &beam.Brief{Loads: []beam.Load{l}} }
	for span, want := range map[int]bool{0: true, 1: true, 2: false} {
		require.Equal(t, want, hungLoads(brief(beam.Load{Shape: beam.Uniform, Hung: true, Span: span}), 1))
		require.False(t, hungLoads(brief(beam.Load{Shape: beam.Uniform, Span: span}), 1))
		torque := beam.Load{Shape: beam.Torque, Moment: units.KipFoot.Of(5), At: in(20), Span: span}
		require.Equal(t, want, concentratedTorque(brief(torque), 1, in(6), in(27)))
		for _, edit := range []func(l *beam.Load){
			func(l *beam.Load) { l.Shape = beam.Couple }, func(l *beam.Load) { l.Moment = units.Moment{} }, func(l *beam.Load) { l.At = in(28) },
		} {
			require.False(t, concentratedTorque(brief(with(torque, edit)), 1, in(6), in(27)))
		}
		require.Equal(t, want, uneven(brief(beam.Load{Shape: beam.Partial, Span: span}), 1))
		require.False(t, uneven(brief(beam.Load{Shape: beam.Uniform, Span: span}), 1))
	}
	// A load over less than half of the span counts as concentrated near its
	// end: twice the even share of it lies within d.
	for to, want := range map[float64]string{131.5: noteLoadInDepth, 132.5: noteAtDepth} {
		tr := shearTrial(t, ACI31819(), func(b *beam.Brief) {
			b.NoSelfWeight = true
			b.Loads = []beam.Load{{Case: beam.Dead, Shape: beam.Partial, Intensity: units.KipPerFoot.Of(1), To: in(to)}}
		})
		ends := shearEnds(tr, 1)
		_, note := ends[0].start(&tr.Forces, 0, 1)
		require.Equal(t, want, note)
	}
	// The least d of the senses that bend an end, and within a short span.
	for top, want := range map[string]float64{"#6": 21.625, "#9": 24 - 1.5 - 0.375 - 0.564} {
		b := usBrief()
		b.Supports[0].Kind, b.Supports[1].Kind = statics.Fixed, statics.Fixed
		b.Loads = append(b.Loads, beam.Load{Case: beam.Wind, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(-6)})
		tr := trialOf(t, problemOf(t, ACI31819(), b), "#3", []group{{5, "#8"}}, []group{{2, top}})
		ends := shearEnds(tr, 1)
		require.InEpsilon(t, want, ends[0].depth(tr, 1).In(units.Inch), 1e-9)
	}
	tr := shearTrial(t, ACI31819(), nil)
	for i, face := range [2]units.Length{in(6), in(258)} {
		for out, want := range map[float64]bool{0: true, 0.01: false} {
			at := face.Add(in(out * float64(2*i-1)))
			if out == 0 {
				at = shearEnds(tr, 1)[i].face
			}
			_, _, on := hungLength(tr.Problem, 1, at)
			require.Equal(t, want, on, "%s", at)
		}
	}
	tr.Brief.Section.Depth = in(300)
	for i, e := range shearEnds(tr, 1) {
		require.InEpsilon(t, 300-2.375, e.depth(tr, 1).In(units.Inch), 1e-9, "end %d", i)
	}
}

// What counts of a flanged face: d and dt are those of the bars within the
// spread, the nearest of which may lie in the flange or in the web.
func TestNearestBarThatCounts(t *testing.T) {
	beyond := flangeRow(beam.Top, 2, "#8", 12)
	for _, k := range []struct {
		rows []beam.Row
		want float64
	}{
		{[]beam.Row{top(4, "#8"), flangeRow(beam.Top, 2, "#4", 7), beyond}, 24 - 1.5 - 0.375 - 0.25},
		{[]beam.Row{top(4, "#8"), second(top(2, "#8")), beyond}, 24 - 1.5 - 0.375 - 0.5},
	} {
		_, tr := check(t, ACI31819(), hoggingTee(20, 60), append([]beam.Row{bottom(2, "#5")}, k.rows...))
		require.True(t, beyondSpread(tr, beam.Negative))
		require.InEpsilon(t, k.want, tensionSteel(tr, beam.Negative).extreme.In(units.Inch), 1e-9)
	}
}

// 25.2.1 between a bar of the web and one beside it, on either side.
func TestGapBesideTheWeb(t *testing.T) {
	for _, shape := range []beam.Shape{beam.Tee, beam.Ell} { // left of the web, and right of it
		b := hoggingTee(20, 60)
		b.Section.Shape = shape
		r, _ := check(t, ACI31819(), b, []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 1, "#8", 1.75)})
		c := facesOf(r.Checks, "spacing.clear", beam.Top)[0]
		require.InDelta(t, 0.75, valueIn(t, c.Capacity, "in"), 1e-9, "%s", shape)
		require.Equal(t, beam.Fail, c.Outcome)
	}
}

// Table 25.3.2 and 25.6.1.3 by size and use.
func TestSizesThatMayBeUsed(t *testing.T) {
	catalog, err := bars.Lookup("astm-inch")
	require.NoError(t, err)
	size := func(name string) bars.Size {
		s, err := catalog.Size(name)
		require.NoError(t, err)
		return s
	}
	bundle := func(name string) bars.Size {
		s, err := catalog.Bundle(name)
		require.NoError(t, err)
		return s
	}
	c := ACI31819()
	require.True(t, c.Allows(bars.Main, size("#14")))
	require.False(t, c.Allows(bars.Main, bundle("2x#14")))
	require.True(t, c.Allows(bars.Main, bundle("4x#11")))
	require.True(t, c.Allows(bars.Stirrup, size("#4")))
	require.False(t, c.Allows(bars.Stirrup, bundle("2x#4")))

	// Of bars in compression the smallest single one counts, a bundle's too, but
	// none in a flange.
	f := beam.FaceSteel{Smallest: size("#6"), Rows: []beam.RowSteel{{Size: size("#6")}, {Size: bundle("2x#5")}, {Size: size("#3"), Flange: true}}}
	require.Equal(t, in(0.625), smallestBar(&f))
}

// Beams deeper than 36 in. (900 mm) need bars along their sides.
func TestDepthThatNeedsSideBars(t *testing.T) {
	for _, c := range Editions() {
		b, limit, tie := usBrief(), in(36), "#3"
		if c.e.system == units.SI {
			b, limit, tie = siBrief(), mm(900), "No. 10"
		}
		b.Spans[0] = units.Metre.Of(12)
		for scale, want := range map[float64]beam.Outcome{1: beam.NotApplicable, 1.005: beam.Fail} {
			b.Section.Depth = limit.Scale(scale)
			bar := map[string]string{"#3": "#8", "No. 10": "No. 25"}[tie]
			tr := trialOf(t, problemOf(t, c, b), tie, []group{{4, bar}}, []group{{2, bar}})
			require.Equal(t, want, only(t, c.e.judgeWhole(nil, tr), "side-face.spacing").Outcome, "%s", c.e.id)
		}
	}
}

func TestNotesOfNothing(t *testing.T) {
	var w working
	w.note("of no step")
	require.Empty(t, w.steps)
	w.given("a", "", "", asPlain(1))
	w.note("kept")
	w.note("")
	require.Equal(t, "kept", w.steps[0].Note)
	require.Equal(t, "mm3", si19.asFirst(1).unit)
	require.Equal(t, "in3", us19.asFirst(1).unit)
}
