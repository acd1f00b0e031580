package aci318

import (
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// The clause of bundles is cited where any bar of a face is a bundle, of two bars
// too (25.6.1).
func TestCoverOfABundleCitesIt(t *testing.T) {
	_, trial := checkUS(t, ACI31819(), []beam.Row{bottom(3, "#8"), top(2, "#8")}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	e := ACI31819().e
	single := trial.Bottom.Largest
	pair, err := bars.Bundle(single, 2)
	require.NoError(t, err)
	for _, tc := range []struct {
		name              string
		largest, smallest bars.Size
		cited             bool
	}{{"singles", single, single, false}, {"a pair the largest", pair, single, true}, {"a pair the smallest", single, pair, true}} {
		trial.Bottom.Largest, trial.Bottom.Smallest = tc.largest, tc.smallest
		clause := facesOf(e.appendCover(nil, trial), "cover.bar", beam.Bottom)[0].Clause
		want := e.cover.clause
		if tc.cited {
			want += ", " + e.cover.bundleClause
		}
		require.Equal(t, want, clause, tc.name)
	}
}

// A bar at the right end of an isolated flange has its cover to that end.
func TestCoverToTheRightEndOfAFlange(t *testing.T) {
	b := hoggingTee(20, 24)
	b.Section.Isolated, b.Section.FlangeThickness = true, in(8)
	_, trial := check(t, ACI31819(), b, []beam.Row{bottom(2, "#5"), top(4, "#8")})
	for _, x := range []float64{-5, 17} {
		cover := flangeCover(trial, beam.Top, &beam.FlangeBar{Size: trial.Top.Largest, X: in(x), Y: in(4)})
		require.InDelta(t, 0.5, cover.In(units.Inch), 1e-9, "%v in.: half an inch to the end", x)
	}
}

// Of limits of 6.3.2.1 that are the same the first of the table is named.
func TestEqualOverhangsNameTheFirst(t *testing.T) {
	for _, tc := range []struct{ clear, span float64 }{{4, 16}, {4, 100}, {100, 16}} {
		o := overhangOf(true, units.Metre.Of(0.25), units.Metre.Of(tc.clear), units.Metre.Of(tc.span))
		require.Equal(t, units.Metre.Of(2), o.width)
		require.Equal(t, "8h", o.governs)
	}
}

// Supports that leave no clear span have no shortest one; any span above zero is
// one.
func TestShortestClearSpanAboveZero(t *testing.T) {
	for _, tc := range []struct {
		span float64
		ok   bool
	}{{12, false}, {24, true}} {
		_, ok := shortestClearSpan(&beam.Brief{Spans: []units.Length{in(tc.span)}, Supports: []beam.Support{{Width: in(12)}, {Width: in(12)}}})
		require.Equal(t, tc.ok, ok)
	}
}

// Of equal moments the first governs.
func TestFirstOfEqualMomentsGoverns(t *testing.T) {
	_, trial := checkUS(t, ACI31819(), []beam.Row{bottom(3, "#8"), top(2, "#8")}, nil,
		beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)}, beam.Demand{Name: "2", Moment: units.KipFoot.Of(100)})
	worst, bent := greatestAction(trial.Problem, beam.Positive)
	require.True(t, bent)
	require.Equal(t, "1", worst.Combination)
}

// An axial force counts with moments of the sense in which it acts alone (9.5.2.1).
func TestForcesOfTheOtherSense(t *testing.T) {
	kipFoot, kip := units.KipFoot, units.Kip
	_, trial := checkUS(t, ACI31819(), []beam.Row{bottom(3, "#8"), top(3, "#8")}, nil,
		beam.Demand{Name: "1", Moment: kipFoot.Of(50)}, beam.Demand{Name: "2", Moment: kipFoot.Of(-100), Axial: kip.Of(-5)},
		beam.Demand{Name: "3", Axial: kip.Of(-5)})
	for _, tc := range []struct {
		sense  beam.Sense
		pulled bool
	}{{beam.Positive, false}, {beam.Negative, true}} {
		greatest, bent := greatestAction(trial.Problem, tc.sense)
		require.True(t, bent)
		u := ACI31819().e.use(trial, tc.sense, greatest)
		require.Equal(t, tc.pulled, u.pulled)
		require.Equal(t, tc.pulled, u.tried)
	}
	_, trial = checkUS(t, ACI31819(), []beam.Row{bottom(3, "#8"), top(3, "#8")}, nil,
		beam.Demand{Name: "1", Moment: kipFoot.Of(-50)}, beam.Demand{Name: "2", Axial: kip.Of(-5)})
	greatest, _ := greatestAction(trial.Problem, beam.Negative)
	require.False(t, ACI31819().e.use(trial, beam.Negative, greatest).tried)
}

// A second route that finds no equilibrium is a failed check that says so.
func TestCrossCheckWithoutEquilibrium(t *testing.T) {
	_, trial := checkUS(t, ACI31819(), []beam.Row{bottom(3, "#8"), top(3, "#8")}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	c := ACI31819().e.judgeCrossCheck(trial, beam.Positive, &beam.Action{}, &flexure{axial: units.Kip.Of(-5000)})
	require.Equal(t, beam.Fail, c.Outcome)
	require.Equal(t, units.Plain(beam.NoCapacity), c.Demand)
	require.Equal(t, units.Plain(1e-6), c.Capacity)
	require.Contains(t, c.Reason, "no equilibrium")
}

// Steel that just is the least of 9.6.1.2 is held against it, not against the
// waiver of 9.6.1.3.
func TestJustTheLeastSteel(t *testing.T) {
	_, trial := checkUS(t, ACI31819(), []beam.Row{bottom(3, "#8"), top(3, "#8")}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(10)})
	e := ACI31819().e
	least := 200.0 / 60000 * 14 * trial.EffectiveDepth(beam.Positive).In(units.Inch)
	a := beam.Action{Moment: units.KipFoot.Of(10)}
	for _, tc := range []struct {
		share  float64
		clause string
	}{{1, "9.6.1.2"}, {0.9, "9.6.1.3"}} {
		trial.Bottom.Area = in2(least * tc.share)
		require.Equal(t, tc.clause, e.judgeMinimum(trial, beam.Positive, &a, false).Clause)
	}

	q := query()
	q.Demand = beam.Demand{Moment: units.KipFoot.Of(10)}
	g, faults := beam.MeasureSection(e.system, &q.Section)
	require.Empty(t, faults)
	f := beam.FlexureStrength{EffectiveDepth: in(23.5), ExtremeDepth: in(23.5), YieldStrain: 60.0 / 29000, MinimumSteel: in2(1), TensionSteel: in2(1)}
	clause, _, _ := e.queryMinimum(&q, &g, &f)
	require.Equal(t, "9.6.1.2", clause)
	f.TensionSteel = in2(0.9)
	clause, need, _ := e.queryMinimum(&q, &g, &f)
	require.Equal(t, "9.6.1.3", clause)
	require.Less(t, need.In(units.SquareInch), 1.0)
	// With bars that yield so late, no tension steel carries the moment within the
	// strains of 9.3.3.1, and nothing is waived.
	f.YieldStrain = 0.9
	clause, _, _ = e.queryMinimum(&q, &g, &f)
	require.Equal(t, "9.6.1.2", clause)
}

// A tension along the steel of one face is all that face's, by statics, and with
// no moment presses on nothing (22.4.3.1).
func TestTensionAlongOneFace(t *testing.T) {
	e := ACI31819().e
	p := e.facePulls(mechanics.Rectangle(in(12), in(24)), units.Kip.Of(-10), units.Moment{}, in(21), in(12))
	require.True(t, p.pulled)
	require.Zero(t, p.share[0])
	require.InDelta(t, 10000, p.share[1], 1e-6)
}

// A layer just above half the depth is of the upper half.
func TestTensionOfHalves(t *testing.T) {
	e := ACI31819().e
	q := query()
	q.Demand = beam.Demand{Name: "1", Axial: units.Kip.Of(-10)}
	q.Layers = []beam.SteelLayer{{Area: in2(1), Depth: in(23), Yield: psi(60000)}, {Area: in2(1), Depth: in(12.95), Yield: psi(60000)}}
	g, faults := beam.MeasureSection(e.system, &q.Section)
	require.Empty(t, faults)
	checks := e.queryTension(&q, &g)
	require.Len(t, checks, 2)
	for _, c := range checks {
		require.InDelta(t, 54, valueIn(t, c.Capacity, "kip"), 1e-9)
	}
}

// A value of a query is within its bounds, or is not and is named.
func TestValueWithinItsBounds(t *testing.T) {
	f := queryFaults{e: ACI31819().e}
	least, most := in(1).Amount(), in(2).Amount()
	require.True(t, f.within("/a", "a", in(2).Amount(), least, most))
	require.Empty(t, f.list)
	require.False(t, f.within("/a", "a", in(3).Amount(), least, most))
	require.Len(t, f.list, 1)
}

// Lightweight concrete denser than Table 19.2.4.1(a) goes has λ = 1, and a yield
// strength above the cap of 9.6.1.2 is said to be.
func TestWhatIsBeyondTheTables(t *testing.T) {
	e := ACI31819().e
	l := e.lightness(&beam.Concrete{Kind: beam.AllLightweight, Strength: psi(4000), Density: units.PoundPerCubicFoot.Of(140)})
	require.Equal(t, 1.0, l.factor)
	m := e.minimumSteel(psi(4000), psi(100000), minimumWidth{web: 12, face: 12, width: 12}, in(20))
	var w working
	m.steelSteps(e, &w)
	require.Equal(t, "fy,min", w.steps[0].Symbol)
	require.NotEmpty(t, w.steps[0].Note)
}

// Two depths of the neutral axis that balance a section are told of.
func TestTwoEquilibriaAreTold(t *testing.T) {
	const told = "more than one depth of the neutral axis balances"
	q := query()
	q.Demand, q.Stirrups = beam.Demand{}, nil
	found := false
	for d := 2.0; d < 8 && !found; d += 0.01 {
		q.Layers = []beam.SteelLayer{{Area: in2(5.4), Depth: in(23.5), Yield: psi(60000)}, {Area: in2(6), Depth: in(d), Yield: psi(60000)}}
		s, err := ACI31819().Strengths(q)
		require.NoError(t, err)
		said := false
		for _, n := range s.Notes {
			said = said || strings.Contains(n, told)
		}
		require.Equal(t, s.Flexure.Equilibria > 1, said, "%v in.", d)
		found = said
	}
	require.True(t, found)
}
