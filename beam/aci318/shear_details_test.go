package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// stepOf is a step of a working.
func stepOf(t *testing.T, steps []beam.Step, symbol string) beam.Step {
	t.Helper()
	for _, s := range steps {
		if s.Symbol == symbol {
			return s
		}
	}
	require.Fail(t, "no step "+symbol)
	return beam.Step{}
}

// The workings of sloping and hanging steel end in the very values compared.
func TestWorkingEndsInWhatIsCompared(t *testing.T) {
	// Two single groups and a series at the left end, weak enough to stay the
	// worst; their bars are above 60 ksi.
	tr := shearTrial(t, ACI31819(), func(b *beam.Brief) {
		b.Reinforcement.Yield, b.Reinforcement.StirrupYield = units.KSI.Of(80), units.KSI.Of(60)
		b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(40), At: in(60)})
	})
	tr.Record = true
	addZone(tr, 2, 10, 6, 258)
	bend(t, tr, beam.BentBars{Bar: "#3", Count: 1, At: in(27), Angle: 45, Rises: "left", Bends: 5, Spacing: in(9)})
	bend(t, tr, beam.BentBars{Bar: "#3", Count: 1, At: in(27), Angle: 45, Rises: "left"})
	bend(t, tr, beam.BentBars{Bar: "#3", Count: 1, At: in(27), Angle: 40, Rises: "left"})
	bend(t, tr, beam.BentBars{Bar: "#11", Count: 9, At: in(27), Angle: 20, Rises: "left"})
	bend(t, tr, beam.BentBars{Bar: "#11", Count: 9, At: in(27), Angle: 45, Rises: "right"})
	z := us19.newWebZone(tr, 1, 0, in(10))
	z.bends = [2]bool{true, true}
	a := tr.Forces.Action(1, 1, in(27.625), true)
	z.seekBent(in(27.625))
	z.offer(beam.Positive, &a, "")
	w := &z.strength
	groups := z.bentGroups(w)
	require.Len(t, groups, 3, "neither the flat nor the wayward one")
	singles := 0.11 * 60000 * (math.Sin(math.Pi/4) + math.Sin(40*math.Pi/180))
	series := 0.11 * 60000 * math.Sqrt2 * 21.625 / 9
	require.InEpsilon(t, singles+series, w.values.bent, 1e-9)
	c := beam.Check{Steps: z.web[0].strengthSteps(&us19, &w.values, groups)}
	requireEvaluable(t, &c)
	require.InEpsilon(t, singles+series, valueIn(t, stepOf(t, c.Steps, "Vb").Value, "lb"), 1e-9)
	require.Equal(t, "min(Vb,2 + Vb,3, 3 √f'c bw d) + Vb,1", stepOf(t, c.Steps, "Vb").Expression)
	require.Equal(t, "capped", stepOf(t, c.Steps, "fb,2").Note)
	require.Equal(t, "22.5.8.6.2", stepOf(t, c.Steps, "Vb,2").Clause)
	require.Equal(t, "22.5.8.6.3", stepOf(t, c.Steps, "Vb,1").Clause)
	require.Equal(t, "Vc + Vs + Vb", stepOf(t, c.Steps, "Vn").Expression)
	require.Equal(t, "22.5.8.4", stepOf(t, c.Steps, "Vn").Clause)
	require.Equal(t, "22.5.8.5.3", stepOf(t, c.Steps, "Vs").Clause)

	// A load that hangs there as well: bent bars are taken off what shear needs.
	tr.Brief.Loads = append(tr.Brief.Loads, beam.Load{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1), Hung: true})
	z = us19.newWebZone(tr, 1, 0, in(10))
	z.bends = [2]bool{true, true}
	z.seekBent(in(27.625))
	z.offer(beam.Positive, &a, "")
	hanger := z.appendHanger(nil)
	require.Len(t, hanger, 1)
	requireEvaluable(t, &hanger[0])
	require.InEpsilon(t, valueIn(t, hanger[0].Demand, "in2/in"), valueIn(t, stepOf(t, hanger[0].Steps, "av,req").Value, "in2/in"), 1e-12)
	require.InEpsilon(t, valueIn(t, hanger[0].Capacity, "in2/in"), valueIn(t, stepOf(t, hanger[0].Steps, "av").Value, "in2/in"), 1e-12)
	require.Contains(t, stepOf(t, hanger[0].Steps, "av,v").Expression, "Vc - Vb")
	vc := 2 * math.Sqrt(4000) * 14 * 21.625
	need := (valueIn(t, a.Shear.Abs().Amount(), "lb")/0.75 - vc - singles - series) / (60000 * 21.625)
	require.InEpsilon(t, 1600.0/12/45000+max(0, need), valueIn(t, hanger[0].Demand, "in2/in"), 1e-9)
	require.Positive(t, need)
	// The worst of several sections is kept, whichever comes first.
	weak := tr.Forces.Action(1, 1, in(100), true)
	z.offer(beam.Positive, &weak, "")
	again := z.appendHanger(nil)
	require.Equal(t, hanger[0].Demand, again[0].Demand)
	z = us19.newWebZone(tr, 1, 0, in(10))
	z.bentBars = false
	z.offer(beam.Positive, &weak, "")
	first := z.hanger.utilization
	z.offer(beam.Positive, &a, "")
	require.Greater(t, z.hanger.utilization, first)
	plain := z.appendHanger(nil)
	require.NotContains(t, stepOf(t, plain[0].Steps, "av,v").Expression, "Vb")

	// Spacing of a series: the shallower of the slope's and the line's reach.
	for _, k := range []struct {
		d     float64
		heavy bool
		want  float64
	}{{17, false, 12}, {17, true, 6}, {10, false, 10}, {10, true, 5}} {
		g := bentGroup{slope: slopeOf(45), height: 16, series: true}
		steps := g.spacingSteps(&us19, k.d, k.heavy)
		requireEvaluable(t, &beam.Check{Steps: steps})
		require.InEpsilon(t, k.want, valueIn(t, stepOf(t, steps, "s,max").Value, "in"), 1e-12)
		require.Equal(t, k.heavy, stepOf(t, steps, "s,max").Note != "")
	}
}

// What is said of bent bars that do not count.
func TestBentBarsSayWhy(t *testing.T) {
	for angle, want := range map[float64]string{30: noteBent, 29: noteFlatBend} {
		tr := bentTrial(t, ACI31819(), beam.BentBars{Bar: "#6", Count: 1, At: in(30), Angle: angle, Rises: "left"})
		require.Equal(t, want, only(t, us19.judgeShearing(nil, tr), "shear.bent-angle").Reason)
	}
	tr := bentTrial(t, ACI31819(), beam.BentBars{Bar: "#6", Count: 1, At: in(30), Angle: 45, Rises: "left", Bends: 2, Spacing: in(10)})
	require.Equal(t, noteWideBends, only(t, us19.judgeShearing(nil, tr), "shear.bent-spacing").Reason)
	tr.Bent[0].Span = 2
	require.False(t, hasBent(tr, 1))
	require.True(t, hasBent(tr, 2))
	require.Empty(t, checksOf(us19.judgeShearing(nil, tr), "shear.bent-angle"), "of another span")
	// The lesser d whichever sense it belongs to.
	tr = trialOf(t, tr.Problem, "#3", []group{{5, "#6"}}, []group{{2, "#11"}})
	require.InEpsilon(t, 24-1.5-0.375-0.705, us19.bentDepth(tr), 1e-12)
	tr.Top.Count = 0
	require.InEpsilon(t, 24-1.5-0.375-0.375, us19.bentDepth(tr), 1e-12)
	// The ends of their reach belong to the sections without them.
	tr = bentTrial(t, ACI31819(), beam.BentBars{Bar: "#8", Count: 1, At: in(40), Angle: 45, Rises: "left"})
	from, to := us19.bentReach(tr, 0)
	require.InEpsilon(t, 40-3.0/8*19.25, from.In(units.Inch), 1e-12)
	require.InEpsilon(t, 40+3.0/8*19.25, to.In(units.Inch), 1e-12)
	require.False(t, us19.bentCounts(tr, 0, 1, from))
	require.False(t, us19.bentCounts(tr, 0, 1, to))
	require.True(t, us19.bentCounts(tr, 0, 1, in(40)))
	require.Equal(t, risesLeft, against(units.Force{}))
}

// Where what hangs begins and ends, sections are judged.
func TestPlacesOfHungLoads(t *testing.T) {
	tr := shearTrial(t, ACI31819(), nil)
	load := func(at float64, hung bool) beam.Load {
		return beam.Load{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(5), At: in(at), Hung: hung}
	}
	tr.Brief.Loads = append(tr.Brief.Loads, load(100, true), load(150, false), load(2, true), load(258, true))
	tr.Brief.Loads = append(tr.Brief.Loads, beam.Load{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1), Hung: true})
	var got []float64
	for _, p := range us19.addPlaces(nil, tr, 1) {
		got = append(got, math.Round(p.In(units.Inch)*1e6)/1e6)
	}
	require.Equal(t, []float64{88, 112, 246, 258}, got)
	_, _, ok := hungLength(tr.Problem, 1, in(258.01))
	require.False(t, ok)
	// A hung point load within the span of a zone's stretch is found at the end of
	// its length, where shear is greater than at the load.
	tr = hangTrial(t, ACI31819(), beam.Load{Shape: beam.PointLoad, Force: units.Kip.Of(10), At: in(50)})
	addZone(tr, 2, 10, 6, 258)
	c := only(t, us19.judgeShearing(nil, tr), "hanger.stirrups")
	require.InEpsilon(t, 38, c.At.In(units.Inch), 1e-9)
}

// Workings and words of joists.
func TestJoistsSayWhy(t *testing.T) {
	s := joistBrief(func(s *beam.Section) { s.Slab, s.FlangeWidth, s.Shape = beam.Slab{}, in(36), beam.Ell }).Section
	g, _ := beam.GeometryOf(&s)
	r := us19.joistRib(&s, &g)
	require.InEpsilon(t, 62, r.clear, 1e-12, "twice the one overhang")
	require.False(t, r.measured)
	require.Equal(t, "at least: the flange reaches no further than half way to the next rib", stepOf(t, r.steps(&us19, "joist.spacing"), "sc").Note)
	slab := r.steps(&us19, "joist.slab")
	require.NotEmpty(t, stepOf(t, slab, "sc").Note)
	require.InEpsilon(t, 62.0/12, valueIn(t, stepOf(t, slab, "hf,min").Value, "in"), 1e-12)
	depth := r.steps(&us19, "joist.rib-depth")
	require.InEpsilon(t, 15, valueIn(t, stepOf(t, depth, "hr").Value, "in"), 1e-12)
	require.InEpsilon(t, 17.5, valueIn(t, stepOf(t, depth, "hr,max").Value, "in"), 1e-12)
	r.measured = true
	require.Empty(t, stepOf(t, r.steps(&us19, "joist.slab"), "sc").Note)
	// A slab of just the least, clear distance not measured: nothing is decided.
	s = joistBrief(func(s *beam.Section) { s.Slab, s.FlangeWidth, s.FlangeThickness = beam.Slab{}, in(35), in(2.5) }).Section
	tr := &beam.Trial{Problem: &beam.Problem{}}
	tr.Brief.Section = s
	tr.Geometry, _ = beam.GeometryOf(&tr.Brief.Section)
	require.Equal(t, beam.NotJudged, only(t, us19.appendJoist(nil, tr), "joist.slab").Outcome)
}

// Words and clauses of the strengths of a section.
func TestStrengthsSayWhichRule(t *testing.T) {
	q := query()
	c := checkOf(t, strengthsOf(t, ACI31819(), q).Checks, "shear.minimum-stirrups")
	require.Equal(t, "9.6.3.4", c.Clause)
	c = checkOf(t, strengthsOf(t, ACI31814(), q).Checks, "shear.minimum-stirrups")
	require.Equal(t, "9.6.3.3", c.Clause)
	q.Stirrups.Legs, q.Stirrups.Across = 3, units.Length{}
	require.Equal(t, "legs spread evenly between the covers", checkOf(t, strengthsOf(t, ACI31819(), q).Checks, "shear.spacing-across").Reason)
	q.Bent = &beam.BentSteel{Area: in2(0.31), Yield: psi(60000), Angle: 45}
	s := strengthsOf(t, ACI31819(), q)
	require.Equal(t, beam.Pass, checkOf(t, s.Checks, "shear.bent-angle").Outcome)
	require.False(t, contains(s.Shear.Notes, "no more than"), "not capped")
	// At its limit exactly nothing is cut: 3 √4500 × 376 lb of bars upright.
	q.Bent = &beam.BentSteel{Area: in2(3 * math.Sqrt(4500) * 376 / 60000), Yield: psi(60000), Angle: 90}
	require.False(t, contains(strengthsOf(t, ACI31819(), q).Shear.Notes, "no more than"))
	q.Bent = &beam.BentSteel{Area: in2(3.1), Yield: psi(60000), Angle: 45, Spacing: in(17)}
	require.False(t, contains(strengthsOf(t, ACI31819(), q).Shear.Notes, "no more than"), "a series has no such limit")

	q = query()
	q.Stirrups = nil
	s = strengthsOf(t, ACI31819(), q)
	require.Equal(t, "no stirrups: the shear may not call for them", checkOf(t, s.Checks, "shear.minimum-stirrups").Reason)
	require.False(t, contains(s.Shear.Notes, "flatter"))

	// Strength calls for stirrups where 9.6.3.1 does not: 12 by 33 in., d = 30 in.,
	// ρw = 0.3 %, few stirrups, between φVc = 15.42 kip and φλ√f'c bw d = 18.9 kip.
	q = beam.SectionQuery{
		Section: beam.Section{Shape: beam.Rectangular, Width: in(12), Depth: in(33)}, Concrete: beam.Concrete{Strength: psi(4900)}, Bending: beam.Positive,
		Layers:   []beam.SteelLayer{{Area: in2(1.08), Depth: in(30), Yield: psi(60000)}},
		Stirrups: &beam.StirrupSteel{Area: in2(0.05), Spacing: in(15), Yield: psi(60000)},
		Demand:   beam.Demand{Shear: units.Kip.Of(18.5)},
	}
	c = checkOf(t, strengthsOf(t, ACI31819(), q).Checks, "shear.minimum-stirrups")
	require.Equal(t, beam.NotApplicable, c.Outcome)
	require.Equal(t, "9.6.3.1 does not call for stirrups; strength does", c.Reason)
	q.Demand.Shear = units.Kip.Of(0.75 * 70 * 360 / 1000)
	require.Equal(t, beam.NotApplicable, checkOf(t, strengthsOf(t, ACI31819(), q).Checks, "shear.minimum-stirrups").Outcome, "at the trigger exactly")
	q.Stirrups.Legs = 21
	_, err := ACI31819().Strengths(q)
	require.ErrorContains(t, err, "2 to 20")
	q.Stirrups.Legs, q.Stirrups.Angle = 2, 10
	_, err = ACI31819().Strengths(q)
	require.ErrorContains(t, err, "15 to 90 degrees")
}
