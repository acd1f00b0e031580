package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// strongBrief is a 16 by 24 in. section of 5000 psi concrete with Grade 100 bars
// and Grade 60 stirrups.
func strongBrief(b *beam.Brief) {
	b.Section.Width = in(16)
	b.Concrete.Strength = psi(5000)
	b.Reinforcement.Yield, b.Reinforcement.StirrupYield = units.KSI.Of(100), units.KSI.Of(60)
}

// A single weak bar in the extreme layer does not class strong steel beside it:
// 4 #9 of Grade 100 need 100/29000 + 0.003, and a #3 of Grade 40 nearer the face
// leaves φ where the strain of 0.0058 puts it (Table 21.2.2).
func TestStrongestSteelInTensionClasses(t *testing.T) {
	demand := beam.Demand{Name: "1", Moment: units.KipFoot.Of(520), Shear: units.Kip.Of(20)}
	weak := bottom(1, "#3")
	weak.Mark, weak.Yield = "weak", units.KSI.Of(40)
	with, trial := checkUS(t, ACI31819(), []beam.Row{bottom(4, "#9"), weak, top(2, "#4")}, strongBrief, demand)
	c := find1(t, with, "flexure.strain.positive")
	require.InEpsilon(t, 100.0/29000+0.003, c.Demand.SI(), 1e-12)
	require.Equal(t, beam.Fail, c.Outcome)
	requireEvaluable(t, c)
	f, ok := ACI31819().e.trialFlexure(trial, beam.Positive)
	require.True(t, ok)
	require.Equal(t, units.KSI.Of(100), f.yield)
	require.InEpsilon(t, 0.65+0.25*(f.strain-100.0/29000)/0.003, f.phi, 1e-12)
	require.Equal(t, transition, f.class)
	strength := find1(t, with, "flexure.positive")
	requireEvaluable(t, strength)
	require.InEpsilon(t, f.phi*f.nominal.In(units.KipFoot), valueIn(t, strength.Capacity, "kip-ft"), 1e-12)
	require.Contains(t, strength.Steps[2].Meaning, "greatest")

	// The reading is listed where it is used, and least steel goes by the weak bar.
	a := assumption(t, with, "reading.grades")
	require.True(t, a.Holds)
	require.Contains(t, a.Assumed, "greatest")
	require.Contains(t, a.UsedIn, "flexure.strain.positive")
	require.InEpsilon(t, 3*70.71067811865476/40000*16*trial.EffectiveDepth(beam.Positive).In(units.Inch),
		valueIn(t, find1(t, with, "flexure.minimum.positive").Demand, "in2"), 1e-9)
	without, _ := checkUS(t, ACI31819(), []beam.Row{bottom(4, "#9"), top(2, "#4")}, strongBrief, demand)
	for _, a := range without.Assumptions {
		require.NotEqual(t, "reading.grades", a.ID)
		require.NotEqual(t, "reading.flange-spread", a.ID)
	}

	// The same of a bare section, whose note says so.
	q := teeQuery()
	q.Section = rectangle(in(16), in(24))
	q.Layers = []beam.SteelLayer{{Area: in2(4), Depth: in(21.5), Yield: psi(100000)}, {Area: in2(0.01), Depth: in(21.51), Yield: psi(40000)}}
	s, err := ACI31819().Strengths(q)
	require.NoError(t, err)
	require.InEpsilon(t, 100.0/29000, s.Flexure.YieldStrain, 1e-12)
	require.InEpsilon(t, 100.0/29000+0.003, s.Flexure.LeastStrain, 1e-12)
	require.Contains(t, s.Notes, noteGrades)
	// A strong layer that is pressed classes nothing.
	q.Layers = []beam.SteelLayer{{Area: in2(4), Depth: in(21.5), Yield: psi(60000)}, {Area: in2(0.5), Depth: in(1.5), Yield: psi(100000)}}
	require.InEpsilon(t, 60.0/29000, flexureOf(t, ACI31819(), q).YieldStrain, 1e-12)
}

// Required steel counts mixed bars with the least of their yield strengths and
// classes the section by the greatest, on which φ of 318-14 depends.
func TestSizingOfMixedGrades(t *testing.T) {
	weak := bottom(1, "#3")
	weak.Mark, weak.Yield = "weak", units.KSI.Of(40)
	_, trial := checkUS(t, ACI31819(), []beam.Row{bottom(4, "#9"), weak, top(2, "#4")}, strongBrief, beam.Demand{Name: "1", Moment: units.KipFoot.Of(520)})
	z := ACI31819().e.trialSizing(trial, beam.Positive)
	require.InEpsilon(t, 40000.0, z.fy, 1e-12)
	require.InEpsilon(t, 100.0/29000, z.yieldStrain, 1e-12)
}

// The bars of every face are held against Table 20.2.2.4, whether a moment pulls
// on them, presses on them, or neither.
func TestGradeOfBarsThatNothingPulls(t *testing.T) {
	for _, tc := range []struct {
		code   Code
		yield  float64 // ksi
		relied bool
		want   beam.Outcome
	}{
		{ACI31814(), 150, true, beam.Fail}, {ACI31814(), 80, true, beam.Pass}, {ACI31819(), 110, false, beam.Fail}, {ACI31819(), 100, false, beam.Pass},
	} {
		row := top(2, "#8")
		row.Yield, row.InCompression = units.KSI.Of(tc.yield), tc.relied
		r, _ := checkUS(t, tc.code, []beam.Row{bottom(4, "#9"), row}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(200)})
		c := find1(t, r, "flexure.grade")
		require.Equal(t, tc.want, c.Outcome, "%s, %v ksi", tc.code.e.id, tc.yield)
		require.Equal(t, beam.Top, c.Face)
		require.Equal(t, tc.code.e.materials.yieldClause, c.Clause)
		require.InEpsilon(t, tc.yield, valueIn(t, c.Demand, "ksi"), 1e-12)
		if tc.want == beam.Fail {
			require.Contains(t, r.Binding, "flexure.grade")
		}
	}
}

// Bars beyond the spread of 24.3.4 lower the strain though the strength leaves
// them out: 4 #8 within a spread of 24 in. and 8 #11 beyond it. Strain
// compatibility with all of them: fewer than 12.48 + 3.16 in2 would balance the
// 12 in. web with a = As fy/(0.85 f'c b), and the strain is far below the limit.
func TestBarsBeyondTheSpreadLowerTheStrain(t *testing.T) {
	bare, _ := check(t, ACI31819(), hoggingTee(20, 60), []beam.Row{bottom(2, "#5"), top(4, "#8")})
	r, trial := check(t, ACI31819(), hoggingTee(20, 60), []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 2, "#11", 12)})
	require.Equal(t, find1(t, bare, "flexure.negative").Capacity, find1(t, r, "flexure.negative").Capacity)
	strain := find1(t, r, "flexure.strain.negative")
	// 3.16 in2 of #8 and 3.12 in2 of #11, all yielding: a = 6.28 × 60/(3.4 × 12).
	c := 6.28 * 60 / (3.4 * 12) / 0.85
	dt := 24 - 1.5 - 0.375 - 0.5
	require.InEpsilon(t, 0.003*(dt-c)/c, strain.Capacity.SI(), 1e-9)
	require.Less(t, strain.Capacity.SI(), find1(t, bare, "flexure.strain.negative").Capacity.SI())
	requireEvaluable(t, strain)
	requireEvaluable(t, find1(t, r, "flexure.negative"))
	require.Contains(t, strain.Steps[0].Note, "beyond the spread")
	require.Equal(t, beam.Pass, find1(t, r, "flexure.cross-check.negative").Outcome)
	a := assumption(t, r, "reading.flange-spread")
	require.True(t, a.Holds)
	require.Contains(t, a.UsedIn, "flexure.negative")
	for _, a := range bare.Assumptions {
		require.NotEqual(t, "reading.flange-spread", a.ID)
	}

	// d, ρw and the critical section of shear are of the bars that count.
	steel := tensionSteel(trial, beam.Negative)
	require.InEpsilon(t, 3.16, steel.area.In(units.SquareInch), 1e-12)
	require.InEpsilon(t, dt, steel.depth.In(units.Inch), 1e-12)
	z := ACI31819().e.newWebZone(trial, 1, 0, in(8))
	web := &z.web[senseIndex(beam.Negative)]
	require.InEpsilon(t, 3.16/12/dt, web.bare.ratio, 1e-12)
	require.InEpsilon(t, dt, web.bare.d, 1e-12)
}

// The flange of an ell lies on one side, so that of the spread, which is centred
// on the web, half is beyond it also under demands: with a compression acting the
// strain is that of all bars and the force. 3.16 in2 of #8, and 0.79 beyond.
func TestStrainOfAllBarsUnderAxialForce(t *testing.T) {
	at := func(axial float64, rows ...beam.Row) *beam.Check {
		b := demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(-100), Axial: units.Kip.Of(axial)})
		b.Section = hoggingTee(20, 60).Section
		b.Section.Shape = beam.Ell
		r, _ := check(t, ACI31819(), b, append([]beam.Row{bottom(2, "#5"), top(4, "#8")}, rows...))
		c := find1(t, r, "flexure.strain.negative")
		requireEvaluable(t, c)
		return c
	}
	dt := 24 - 1.5 - 0.375 - 0.5
	strain := func(area, pn float64) float64 {
		c := (area*60 + pn) / (3.4 * 12) / 0.85
		return 0.003 * (dt - c) / c
	}
	far := flangeRow(beam.Top, 1, "#8", 40)
	for _, tc := range []struct {
		axial, want float64
		note        string
		rows        []beam.Row
	}{
		{0, strain(3.16, 0), "", nil},
		{20, strain(3.16, 20/0.9), "with the axial force acting", nil},
		{0, strain(3.95, 0), "with " + noteAllPull, []beam.Row{far}},
		{20, strain(3.95, 20/0.9), "with the axial force acting, and " + noteAllPull, []beam.Row{far}},
		{-20, strain(3.95, 0), "with " + noteAllPull, []beam.Row{far}},
	} {
		c := at(tc.axial, tc.rows...)
		require.InEpsilon(t, tc.want, c.Capacity.SI(), 1e-9, "%v kip, %d rows", tc.axial, len(tc.rows))
		require.Equal(t, tc.note, c.Steps[0].Note)
	}
}

// Bars along the sides are held against the tables too, each time once, and
// class the section where they count and pull: #5 of Grade 80 beside bars of
// Grade 60.
func TestGradeOfSideBars(t *testing.T) {
	side := beam.Row{Mark: "W", Bar: "#5", Count: 2, Face: beam.Side, Spacing: in(9)}
	for _, tc := range []struct {
		yield float64 // ksi
		want  beam.Outcome
	}{{80, beam.Pass}, {110, beam.Fail}, {39, beam.Fail}} {
		side.Yield = units.KSI.Of(tc.yield)
		for _, counted := range []bool{false, true} {
			r, _ := checkUS(t, ACI31819(), []beam.Row{bottom(4, "#9"), top(2, "#4"), side}, func(b *beam.Brief) {
				b.Section.Depth, b.Readings.CountSideBars = in(40), counted
			}, beam.Demand{Name: "1", Moment: units.KipFoot.Of(200)})
			c := find1(t, r, "flexure.grade")
			require.Equal(t, tc.want, c.Outcome, "%v ksi", tc.yield)
			require.Equal(t, beam.Side, c.Face)
			class := 60.0
			if counted {
				class = max(class, tc.yield)
			}
			// 24.3.2 along the sides goes by 2/3 of the strongest: cc = 1.875 in.
			fs := 2.0 / 3 * max(60, tc.yield)
			require.InEpsilon(t, min(15*40/fs-2.5*1.875, 12*40/fs), valueIn(t, find1(t, r, "side-face.spacing").Capacity, "in"), 1e-9)
			require.InEpsilon(t, class/29000+0.003, find1(t, r, "flexure.strain.positive").Demand.SI(), 1e-12)
		}
	}
	side.Yield = units.Stress{}
	r, _ := checkUS(t, ACI31819(), []beam.Row{bottom(4, "#9"), top(2, "#4"), side}, func(b *beam.Brief) { b.Section.Depth = in(40) }, beam.Demand{Name: "1", Moment: units.KipFoot.Of(200)})
	require.Empty(t, checksOf(r.Checks, "flexure.grade"))
}
