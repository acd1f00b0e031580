package aci318

import (
	"context"
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// spy is a code that keeps the trial it last judged, for tests that look at
// one directly.
type spy struct {
	Code
	trial **beam.Trial
}

func (s spy) Judge(dst []beam.Check, g beam.Group, t *beam.Trial) []beam.Check {
	*s.trial = t
	return s.Code.Judge(dst, g, t)
}

// checkUS judges bars in a 14 by 24 in. section of 4000 psi concrete and Grade
// 60 bars under demands.
func checkUS(t testing.TB, c Code, rows []beam.Row, edit func(b *beam.Brief), demands ...beam.Demand) (*beam.Result, *beam.Trial) {
	t.Helper()
	b := beam.Brief{
		Section:       beam.Section{Shape: beam.Rectangular, Width: in(14), Depth: in(24)},
		Concrete:      beam.Concrete{Strength: psi(4000)},
		Reinforcement: beam.Reinforcement{Catalog: "astm-inch", Yield: psi(60000)},
		Exposure:      beam.Interior,
		Demands:       demands,
	}
	if edit != nil {
		edit(&b)
	}
	return check(t, c, b, rows)
}

func check(t testing.TB, c Code, b beam.Brief, rows []beam.Row) (*beam.Result, *beam.Trial) {
	t.Helper()
	layout := beam.Layout{
		Longitudinal: rows,
		Transverse:   []beam.Zone{{Mark: "S", Bar: "#3", Legs: 2, Spacing: in(8), Form: "closed"}},
	}
	if len(b.Spans) > 0 {
		layout.Transverse[0].Span, layout.Transverse[0].To = 1, b.Spans[0]
	}
	var trial *beam.Trial
	r, err := beam.CheckLayout(context.Background(), spy{c, &trial}, b, layout)
	require.NoError(t, err)
	require.Empty(t, r.Refusals)
	return r, trial
}

func bottom(count int, bar string) beam.Row {
	return beam.Row{Mark: "B", Bar: bar, Count: count, Face: beam.Bottom, Layer: 1}
}

func top(count int, bar string) beam.Row {
	return beam.Row{Mark: "T", Bar: bar, Count: count, Face: beam.Top, Layer: 1}
}

func find1(t testing.TB, r *beam.Result, id string) *beam.Check {
	t.Helper()
	for i := range r.Checks {
		if r.Checks[i].ID == id {
			return &r.Checks[i]
		}
	}
	require.Fail(t, "no check "+id)
	return nil
}

// 3 No. 9 in a 14 by 24 in. beam, #3 stirrups, 1.5 in. cover: d = 24 - 1.5 -
// 0.375 - 0.564 = 21.561 in; own calculation: a = 3 × 60/(0.85 × 4 × 14) =
// 3.78151 in, φMn = 0.9 × 180 × (21.561 - 1.890756)/12 = 265.548 kip-ft.
func TestJudgeFlexure(t *testing.T) {
	r, _ := checkUS(t, ACI31819(), []beam.Row{bottom(3, "#9"), top(2, "#4")}, nil,
		beam.Demand{Name: "gravity", Moment: units.KipFoot.Of(250)}, beam.Demand{Name: "other", Moment: units.KipFoot.Of(200)})
	c := find1(t, r, "flexure.positive")
	require.InDelta(t, 265.548, c.Capacity.SI()/units.KipFoot.Of(1).In(units.NewtonMetre), 5e-4)
	require.InDelta(t, 250.0/265.548, c.Utilization, 1e-5)
	require.Equal(t, beam.Pass, c.Outcome)
	require.Equal(t, "gravity", c.Combination)
	require.Equal(t, beam.Bottom, c.Face)
	require.Equal(t, beam.Pass, find1(t, r, "flexure.strain.positive").Outcome)
	require.Equal(t, beam.Pass, find1(t, r, "flexure.minimum.positive").Outcome)
	require.Equal(t, beam.Pass, find1(t, r, "flexure.cross-check.positive").Outcome)
	require.Equal(t, beam.NotApplicable, find1(t, r, "flexure.negative").Outcome)
}

// A limit met exactly passes; a shade more does not.
func TestStrengthMetExactlyPasses(t *testing.T) {
	rows := []beam.Row{bottom(3, "#9"), top(2, "#4")}
	r, _ := checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	design := find1(t, r, "flexure.positive").Capacity
	exact := units.NewtonMetre.Of(design.SI())
	r, _ = checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: exact})
	require.Equal(t, beam.Pass, find1(t, r, "flexure.positive").Outcome)
	r, _ = checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: exact.Scale(1 + 1e-6)})
	require.Equal(t, beam.Fail, find1(t, r, "flexure.positive").Outcome)
}

// A sense that is bent and has no bars fails; the other face of the section
// does not help unless it is relied on.
func TestBentWithoutBars(t *testing.T) {
	r, _ := checkUS(t, ACI31819(), []beam.Row{bottom(3, "#9")}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(-20)})
	c := find1(t, r, "flexure.negative")
	require.Equal(t, beam.Fail, c.Outcome)
	require.Equal(t, beam.NoCapacity, c.Utilization)
	require.Equal(t, beam.NotApplicable, find1(t, r, "flexure.positive").Outcome)
}

// Hanger bars are not compression steel: they count only when relied on.
func TestHangersDoNotCount(t *testing.T) {
	relied := top(2, "#8")
	relied.InCompression = true
	demand := beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)}
	r, _ := checkUS(t, ACI31819(), []beam.Row{bottom(4, "#9"), top(2, "#8")}, nil, demand)
	hanging := find1(t, r, "flexure.positive").Capacity
	r, _ = checkUS(t, ACI31819(), []beam.Row{bottom(4, "#9"), relied}, nil, demand)
	with := find1(t, r, "flexure.positive").Capacity
	require.Less(t, hanging.SI(), with.SI())
}

// 9.3.3.1: the same bars at a strain of 0.0045 pass under 318-14 and fail
// under 318-19, whatever the moment. Own calculation: 6 No. 9 in one layer of
// a 14 by 22 in. section, d = 19.561 in: a = 360/47.6 = 7.563 in,
// c = 8.8977 in, strain = 0.003 × 10.663/8.8977 = 0.003595 under both;
// 5 No. 9 give c = 7.4147 in and 0.004914.
func TestStrainLimitByEdition(t *testing.T) {
	edit := func(b *beam.Brief) { b.Section.Depth = in(22) }
	demand := beam.Demand{Name: "1", Moment: units.KipFoot.Of(10)}
	for _, tc := range []struct {
		code  Code
		count int
		want  beam.Outcome
	}{
		{ACI31814(), 5, beam.Pass},
		{ACI31819(), 5, beam.Fail},
		{ACI31814(), 6, beam.Fail},
		{ACI31819(), 4, beam.Pass},
	} {
		r, _ := checkUS(t, tc.code, []beam.Row{bottom(tc.count, "#9"), top(2, "#4")}, edit, demand)
		c := find1(t, r, "flexure.strain.positive")
		require.Equal(t, tc.want, c.Outcome, "%d bars under %s", tc.count, tc.code.e.id)
		if tc.count == 5 {
			require.InDelta(t, 0.004914, c.Capacity.SI(), 5e-7)
		}
	}
}

// 9.6.1.2 and the waiver of 9.6.1.3. As,min = 200/60000 × 14 × d: with 2 No. 5
// d = 21.8125 in and As,min = 1.018 in2 against 0.62 in2; 4/3 of the steel
// required for a moment waives it. For 20 kip-ft a = 21.8125 - √(21.8125² -
// 480/(0.9 × 0.85 × 4 × 14)) = 0.2584 in., As = 0.2050 in2 and 4/3 of it 0.2733
// in2; for 59 kip-ft 0.6119 and 0.8159 in2.
func TestLeastSteelAndItsWaiver(t *testing.T) {
	rows := []beam.Row{bottom(2, "#5"), top(2, "#4")}
	r, _ := checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(20)})
	c := find1(t, r, "flexure.minimum.positive")
	require.Equal(t, beam.Pass, c.Outcome)
	require.Equal(t, "9.6.1.3", c.Clause)
	a := 21.8125 - math.Sqrt(21.8125*21.8125-2*240/(0.9*0.85*4*14))
	require.InEpsilon(t, 4.0/3*0.85*4*14*a/60, units.SquareMetre.Of(c.Demand.SI()).In(units.SquareInch), 1e-9)

	r, _ = checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(59)})
	c = find1(t, r, "flexure.minimum.positive")
	require.Equal(t, beam.Pass, find1(t, r, "flexure.positive").Outcome)
	require.Equal(t, beam.Fail, c.Outcome, "the waiver asks 4/3 of the steel required, not the steel required")
	require.Equal(t, "9.6.1.3", c.Clause)

	// More moment than such bars carry: the waiver is not nearer than As,min.
	r, _ = checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(120)})
	c = find1(t, r, "flexure.minimum.positive")
	require.Equal(t, "9.6.1.2", c.Clause)
	require.InEpsilon(t, 200.0/60000*14*21.8125, units.SquareMetre.Of(c.Demand.SI()).In(units.SquareInch), 1e-9)
}

// 24.3.2 with fs = 40 ksi: cc = 1.5 + 0.375 in, s = min(15 - 2.5 cc, 12) =
// 10.3125 in. Two bars of a 20 in. wide beam stand wider apart than that; a
// single bar is judged by the width of the face (24.3.3).
func TestCrackSpacing(t *testing.T) {
	wide := func(b *beam.Brief) { b.Section.Width = in(20) }
	demand := beam.Demand{Name: "1", Moment: units.KipFoot.Of(50)}
	r, _ := checkUS(t, ACI31819(), []beam.Row{bottom(2, "#9"), top(2, "#4")}, wide, demand)
	c := find1(t, r, "crack.spacing")
	require.Equal(t, beam.Fail, c.Outcome)
	require.InDelta(t, 10.3125, units.Metre.Of(c.Capacity.SI()).In(units.Inch), 1e-9)
	r, _ = checkUS(t, ACI31819(), []beam.Row{bottom(3, "#9"), top(2, "#4")}, wide, demand)
	require.Equal(t, beam.Pass, find1(t, r, "crack.spacing").Outcome)

	narrow := func(b *beam.Brief) { b.Section.Width = in(10) }
	r, _ = checkUS(t, ACI31819(), []beam.Row{bottom(1, "#9"), top(2, "#4")}, narrow, demand)
	require.Equal(t, beam.Pass, find1(t, r, "crack.single-bar").Outcome)
	r, _ = checkUS(t, ACI31819(), []beam.Row{bottom(1, "#9"), top(2, "#4")}, nil, demand)
	require.Equal(t, beam.Fail, find1(t, r, "crack.single-bar").Outcome)
}

// Every step of the working of bending follows from the steps before it, in
// every edition, singly and doubly reinforced, in layers, either sense.
func TestBendingWorkingIsEvaluable(t *testing.T) {
	relied := top(3, "#7")
	relied.InCompression = true
	second := beam.Row{Mark: "B2", Bar: "#9", Count: 2, Face: beam.Bottom, Layer: 2}
	for _, rows := range map[string][]beam.Row{
		"single":                    {bottom(3, "#9"), top(2, "#4")},
		"two layers":                {bottom(4, "#9"), second, top(2, "#4")},
		"compression steel":         {bottom(4, "#9"), relied},
		"more than balances":        {bottom(6, "#11"), {Mark: "B2", Bar: "#11", Count: 6, Face: beam.Bottom, Layer: 2}, relied},
		"layers and compression":    {bottom(5, "#9"), second, relied},
		"little steel, for 9.6.1.3": {bottom(2, "#4"), top(2, "#4")},
	} {
		for _, c := range Editions() {
			for _, fc := range []units.Stress{psi(4000), psi(5500), psi(9000)} {
				for _, readings := range []beam.Readings{{}, {RoundedYield: true, IgnoreDisplaced: true}} {
					r, _ := checkUS(t, c, rows, func(b *beam.Brief) {
						b.Concrete.Strength, b.Readings = fc, readings
					}, beam.Demand{Name: "1", Moment: units.KipFoot.Of(10)}, beam.Demand{Name: "2", Moment: units.KipFoot.Of(-8)})
					judged := 0
					for i := range r.Checks {
						switch k := &r.Checks[i]; k.ID {
						case "flexure.positive", "flexure.negative", "flexure.strain.positive", "flexure.strain.negative",
							"flexure.minimum.positive", "flexure.minimum.negative", "crack.spacing":
							requireEvaluable(t, k)
							judged++
						}
					}
					require.Equal(t, 8, judged)
				}
			}
		}
	}
}

// So is that of least steel under the cap on fy of 318-19.
func TestWorkingOfCappedLeastSteel(t *testing.T) {
	strong := func(b *beam.Brief) { b.Reinforcement.Yield, b.Concrete.Strength = psi(100000), psi(6000) }
	r, _ := checkUS(t, ACI31819(), []beam.Row{bottom(3, "#6"), top(2, "#4")}, strong, beam.Demand{Name: "1", Moment: units.KipFoot.Of(80)})
	c := find1(t, r, "flexure.minimum.positive")
	requireEvaluable(t, c)
	d := 24 - 1.5 - 0.375 - 0.375
	require.InEpsilon(t, 3*math.Sqrt(6000)/80000*14*d, units.SquareMetre.Of(c.Demand.SI()).In(units.SquareInch), 1e-9)
}

// The working ends in the values that the check compares.
func TestBendingWorkingEndsInTheCheck(t *testing.T) {
	r, _ := checkUS(t, ACI31819(), []beam.Row{bottom(3, "#9"), top(2, "#4")}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(150)})
	c := find1(t, r, "flexure.positive")
	last := c.Steps[len(c.Steps)-1]
	require.Equal(t, "φMn", last.Symbol)
	require.Equal(t, c.Capacity, last.Value)
	require.Equal(t, "lb-in", last.Unit)
}

// With spans the moment is that between the faces of the supports (9.4.2.1):
// for a fixed-ended beam the moment at the face is less than that at the
// centre of the support. w = 1.2 (350) + 1.6 (1500) lb/ft over 20 ft; own
// calculation: M(x) = w (L x/2 - x²/2 - L²/12) at x = 0.5 ft.
func TestMomentAtTheFace(t *testing.T) {
	b := beam.Brief{
		Section:       beam.Section{Shape: beam.Rectangular, Width: in(14), Depth: in(24)},
		Concrete:      beam.Concrete{Strength: psi(4000)},
		Reinforcement: beam.Reinforcement{Catalog: "astm-inch", Yield: psi(60000)},
		Exposure:      beam.Interior,
		Spans:         []units.Length{units.Foot.Of(20)},
		Supports:      []beam.Support{{Kind: statics.Fixed, Width: in(12)}, {Kind: statics.Fixed, Width: in(12)}},
		Loads:         []beam.Load{{Case: beam.Live, Shape: beam.Uniform, Intensity: units.PoundPerFoot.Of(1500)}},
	}
	r, _ := check(t, ACI31819(), b, []beam.Row{bottom(3, "#7"), top(3, "#7")})
	w := 1.2*350 + 1.6*1500
	face := w * (20*0.5/2 - 0.5*0.5/2 - 20.0*20/12)
	c := find1(t, r, "flexure.negative")
	require.InEpsilon(t, -face, units.NewtonMetre.Of(c.Demand.SI()).In(units.PoundFoot), 1e-9)
	require.Equal(t, "1.2D + 1.6L", c.Combination)
	require.True(t, c.HasAt)
	require.Equal(t, beam.Top, c.Face)
	c = find1(t, r, "flexure.positive")
	require.InEpsilon(t, w*400/24, units.NewtonMetre.Of(c.Demand.SI()).In(units.PoundFoot), 1e-9)
	require.InEpsilon(t, 10.0, c.At.In(units.Foot), 1e-9)
}

// The hot path of a search allocates nothing once its storage has grown.
func TestJudgeBendingAllocatesNothing(t *testing.T) {
	relied := top(2, "#8")
	relied.InCompression = true
	_, trial := checkUS(t, ACI31819(), []beam.Row{bottom(4, "#9"), relied}, nil,
		beam.Demand{Name: "1", Moment: units.KipFoot.Of(200)}, beam.Demand{Name: "2", Moment: units.KipFoot.Of(-50)})
	trial.Record = false
	var dst []beam.Check
	judge := func() { dst = ACI31819().Judge(dst[:0], beam.Bending, trial) }
	judge()
	require.Zero(t, testing.AllocsPerRun(200, judge))
	require.NotEmpty(t, dst)
}
