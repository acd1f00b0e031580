package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// flangeRow is a row of bars beside the web.
func flangeRow(face beam.Face, count int, bar string, spacing float64) beam.Row {
	return beam.Row{Mark: "F", Bar: bar, Count: count, Face: face, Layer: 1, Flange: true, Spacing: in(spacing)}
}

// hoggingTee is a cantilever whose tee flange is in tension, of a clear
// projection in feet: 12 in. web, 24 in. deep, flange 4 in. by a width.
func hoggingTee(clear, flange float64) beam.Brief {
	b := usBrief()
	b.Section = beam.Section{Shape: beam.Tee, Width: in(12), Depth: in(24), FlangeThickness: in(4), FlangeWidth: in(flange)}
	b.Spans = []units.Length{units.Foot.Of(clear + 0.5)}
	b.Supports = []beam.Support{{Kind: statics.Fixed, Width: in(12)}, {Kind: statics.Free}}
	b.Loads = b.Loads[:1]
	b.Loads[0].Intensity = units.KipPerFoot.Of(0.5)
	return b
}

// 24.3.4 in a tee of 36 in. and, with ℓn = 20 ft, a spread of ℓn/10 = 24 in:
// 6 in. on each side of the web. #8 with 1.875 in. of cover inside #3 stirrups:
// the corner bars of the web stand at 1.5 + 0.375 + 0.75 = 2.625 in, the tangent
// point of the bend. Grade 60 and cc = 1.875 in allow 15 - 2.5 × 1.875 =
// 10.3125 in. Own calculation.
func TestSteelInAFlangeInTension(t *testing.T) {
	for _, tc := range []struct {
		name    string
		rows    []beam.Row
		spread  beam.Outcome
		found   float64
		spacing float64 // greatest, to the edge of the spread too
		within  beam.Outcome
	}{
		{"all in the web", []beam.Row{top(4, "#8")}, beam.Fail, 0, 2.625 + 6, beam.Pass},
		{"on one side", []beam.Row{top(4, "#8"), flangeRow(beam.Top, 1, "#8", 7)}, beam.Fail, 1, 2.625 + 6, beam.Pass},
		// -(2.625 - 7) = 4.375 in beyond the web: 1.625 in to the edge.
		{"on both sides", []beam.Row{top(4, "#8"), flangeRow(beam.Top, 2, "#8", 7)}, beam.Pass, 2, 7, beam.Pass},
		{"exactly at the edge", []beam.Row{top(4, "#8"), flangeRow(beam.Top, 2, "#8", 8.625)}, beam.Pass, 2, 8.625, beam.Pass},
		{"beyond the spread", []beam.Row{top(4, "#8"), flangeRow(beam.Top, 2, "#8", 8.7)}, beam.Fail, 0, 8.625, beam.Pass},
		{"two bars in the web", []beam.Row{top(2, "#8"), flangeRow(beam.Top, 2, "#8", 8)}, beam.Pass, 2, 8, beam.Pass},
	} {
		t.Run(tc.name, func(t *testing.T) {
			r, trial := check(t, ACI31819(), hoggingTee(20, 36), append([]beam.Row{bottom(2, "#5")}, tc.rows...))
			require.InDelta(t, 24, ACI31819().Spread(trial.Problem, beam.Top).In(units.Inch), 1e-9)
			c := find1(t, r, "crack.flange-spread")
			require.Equal(t, tc.spread, c.Outcome)
			require.Equal(t, beam.Top, c.Face)
			require.Equal(t, 2.0, c.Demand.SI())
			require.Equal(t, tc.found, c.Capacity.SI())
			s := find1(t, r, "crack.flange-spacing")
			require.InDelta(t, tc.spacing, valueIn(t, s.Demand, "in"), 1e-9)
			require.InDelta(t, 10.3125, valueIn(t, s.Capacity, "in"), 1e-9)
			require.Equal(t, tc.within, s.Outcome)
			requireEvaluable(t, s)
		})
	}
}

// The greatest spacing fails where a strip of the spread is left bare: a flange
// of 60 in. over 40 ft spreads to 48 in, 18 in. beyond the web on each side; one
// bar 4.375 in. out leaves 13.625 in. to the edge, and at 14 in. out its own
// distance of 16.625 in.
func TestFlangeLeftBare(t *testing.T) {
	for spacing, want := range map[float64]float64{7: 18 - 4.375, 16.625: 16.625} {
		rows := []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 2, "#8", spacing)}
		r, _ := check(t, ACI31819(), hoggingTee(40, 60), rows)
		c := find1(t, r, "crack.flange-spacing")
		require.InDelta(t, want, valueIn(t, c.Demand, "in"), 1e-9)
		require.Equal(t, beam.Fail, c.Outcome)
	}
	// crack.spacing sees the bars of the flange too.
	r, _ := check(t, ACI31819(), hoggingTee(40, 60), []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 2, "#8", 16.625)})
	c := find1(t, r, "crack.spacing")
	require.InDelta(t, 16.625, valueIn(t, c.Demand, "in"), 1e-9)
	require.Equal(t, beam.Fail, c.Outcome)
}

// Where the spread is no wider than a bar with its cover needs, all of the steel
// may lie in the web: a flange of 14 in. leaves 1 in. a side.
func TestNarrowFlangeNeedsNoBars(t *testing.T) {
	r, _ := check(t, ACI31819(), hoggingTee(20, 14), []beam.Row{bottom(2, "#5"), top(4, "#8")})
	require.Equal(t, beam.NotApplicable, find1(t, r, "crack.flange-spread").Outcome)
	require.Empty(t, checksOf(r.Checks, "crack.flange-spacing"))
	require.Empty(t, checksOf(r.Checks, "crack.flange-outer"))
	// In sagging the flange is in compression, and 24.3.4 is silent.
	b := demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	b.Section = hoggingTee(20, 36).Section
	r, _ = check(t, ACI31819(), b, []beam.Row{bottom(3, "#8"), top(2, "#5")})
	require.Empty(t, checksOf(r.Checks, "crack.flange-spread"))
}

// The edge of the room: a #8 beside the web needs 1.5 in. of cover and half its
// diameter to the end of the flange, and as much again of its own: overhangs of
// less than 1.5 + 1 = 2.5 in. leave nothing, a shade more something.
func TestRoomForABarBesideTheWeb(t *testing.T) {
	for width, want := range map[float64]beam.Outcome{12 + 4.99: beam.NotApplicable, 12 + 5.01: beam.Fail} {
		r, _ := check(t, ACI31819(), hoggingTee(40, width), []beam.Row{bottom(2, "#5"), top(4, "#8")})
		require.Equal(t, want, find1(t, r, "crack.flange-spread").Outcome, "flange of %v in", width)
	}
}

// Bars farther out than 24.3.4 spreads the tension steel are no tension steel:
// they count neither in strength nor against least steel.
func TestBarsBeyondTheSpreadDoNotCount(t *testing.T) {
	strength := func(rows ...beam.Row) (moment, steel float64) {
		r, _ := check(t, ACI31819(), hoggingTee(20, 60), append([]beam.Row{bottom(2, "#5"), top(4, "#8")}, rows...))
		return valueIn(t, find1(t, r, "flexure.negative").Capacity, "kip-ft"), valueIn(t, find1(t, r, "flexure.minimum.negative").Capacity, "in2")
	}
	bare, area := strength()
	require.InDelta(t, 3.16, area, 1e-9)
	out, area := strength(flangeRow(beam.Top, 2, "#8", 12))
	require.InDelta(t, 3.16, area, 1e-9)
	require.InDelta(t, bare, out, 1e-9)
	within, area := strength(flangeRow(beam.Top, 2, "#8", 8))
	require.InDelta(t, 4.74, area, 1e-9)
	require.Greater(t, within, bare*1.3)
	// Of four in a row the inner two lie within: 5 and 10 in. from the web's
	// outermost bar, 2.375 and 7.375 in. beyond the web.
	mixed, area := strength(flangeRow(beam.Top, 4, "#8", 5))
	require.InDelta(t, 4.74, area, 1e-9)
	require.InDelta(t, within, mixed, 1e-9)
}

// 24.3.4 with 24.4.3 in the outer flange: 60 in. wide, spread 24 in, so that 18
// in. a side lie beyond, 4 in. thick: 0.0018 × 18 × 4 = 0.1296 in2 of Grade 60;
// in 318-14 0.0020 for Grade 40 (0.144 in2) and 0.0018 × 60/80 = 0.00135, but
// 0.0014 at least, for Grade 80 (0.1008 in2).
func TestOuterFlange(t *testing.T) {
	for _, tc := range []struct {
		code  Code
		grade float64
		want  float64
	}{
		{ACI31819(), 60, 0.1296}, {ACI31819(), 40, 0.1296}, {ACI31819(), 80, 0.1296},
		{ACI31814(), 60, 0.1296}, {ACI31814(), 40, 0.144}, {ACI31814(), 80, 0.1008}, {ACI31814(), 70, 0.1296 * 6 / 7},
	} {
		b := hoggingTee(20, 60)
		b.Reinforcement.Yield = units.KSI.Of(tc.grade)
		rows := []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 2, "#8", 7), flangeRow(beam.Top, 2, "#4", 6)}
		r, _ := check(t, tc.code, b, rows)
		c := find1(t, r, "crack.flange-outer")
		require.InDelta(t, tc.want, valueIn(t, c.Demand, "in2"), 1e-9, "%s, Grade %v", tc.code.e.id, tc.grade)
		require.InDelta(t, 0.20, valueIn(t, c.Capacity, "in2"), 1e-9)
		require.Equal(t, beam.Pass, c.Outcome)
		requireEvaluable(t, c)
	}
	// Only on one side: the other has none.
	r, _ := check(t, ACI31819(), hoggingTee(20, 60), []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 2, "#8", 7), flangeRow(beam.Top, 1, "#4", 6)})
	require.Equal(t, beam.Fail, find1(t, r, "crack.flange-outer").Outcome)
	// None given: the slab has its own.
	r, _ = check(t, ACI31819(), hoggingTee(20, 60), []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 2, "#8", 7)})
	require.Equal(t, beam.NotJudged, find1(t, r, "crack.flange-outer").Outcome)
	// ℓn/10 wide enough, met exactly: 50 ft.
	r, _ = check(t, ACI31819(), hoggingTee(50, 60), []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 6, "#8", 8)})
	require.Empty(t, checksOf(r.Checks, "crack.flange-outer"))
	// Demands have no clear span.
	d := demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(-100)})
	d.Section = hoggingTee(20, 60).Section
	r, trial := check(t, ACI31819(), d, []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 6, "#8", 8)})
	require.Equal(t, beam.NotJudged, find1(t, r, "crack.flange-outer").Outcome)
	require.InDelta(t, 60, ACI31819().Spread(trial.Problem, beam.Top).In(units.Inch), 1e-9)
	require.True(t, ACI31819().Spread(trial.Problem, beam.Bottom).IsZero())
}

// The SI values of 24.4.3.2 are those of the printed edition: Grade 420 in
// 318M-14 has 0.0018, Grade 550 0.0018 × 420/550 = 0.0013745, hence 0.0014, and
// Grade 280 0.0020.
func TestShrinkageRatioSI(t *testing.T) {
	e := ACI31814M().e
	require.InDelta(t, 0.0018, e.shrinkageRatio(mpa(420)), 1e-15)
	require.InDelta(t, 0.0014, e.shrinkageRatio(mpa(550)), 1e-15)
	require.InDelta(t, 0.0018*420/500, e.shrinkageRatio(mpa(500)), 1e-15)
	require.InDelta(t, 0.0020, e.shrinkageRatio(mpa(280)), 1e-15)
	require.InDelta(t, 0.0018, ACI31819M().e.shrinkageRatio(mpa(280)), 1e-15)
}

// Clear distances see the bars of the flange: 2 in. between the centres of #8
// bars leaves 1 in, exactly what they need; 1.9 in. does not do.
func TestClearDistancesOfFlangeBars(t *testing.T) {
	for spacing, want := range map[float64]beam.Outcome{2: beam.Pass, 1.9: beam.Fail} {
		for count := range 2 { // one bar a side, against the web; two, against each other too
			rows := []beam.Row{bottom(2, "#5"), top(2, "#8"), flangeRow(beam.Top, 2+2*count, "#8", spacing)}
			r, _ := check(t, ACI31819(), hoggingTee(20, 60), rows)
			for _, c := range checksOf(r.Checks, "spacing.clear") {
				if c.Face == beam.Top {
					require.Equal(t, want, c.Outcome)
					require.InDelta(t, spacing-1, valueIn(t, c.Capacity, "in"), 1e-9)
				}
			}
		}
	}
}

// Cover of bars in a flange: to its other face (a 4 in. flange leaves 4 - 1.875
// - 0.5 = 1.625 in. to the centre of a #8, less 0.5), and to its end where the
// flange ends in the open.
func TestCoverOfFlangeBars(t *testing.T) {
	cover := func(b beam.Brief, rows ...beam.Row) beam.Check {
		r, _ := check(t, ACI31819(), b, append([]beam.Row{bottom(2, "#5"), top(4, "#8")}, rows...))
		for _, c := range checksOf(r.Checks, "cover.bar") {
			if c.Face == beam.Top {
				return c
			}
		}
		require.Fail(t, "no check")
		return beam.Check{}
	}
	c := cover(hoggingTee(20, 60), flangeRow(beam.Top, 2, "#8", 7))
	require.InDelta(t, 4-1.5-0.375-1, valueIn(t, c.Capacity, "in"), 1e-9)
	require.Equal(t, beam.Fail, c.Outcome)
	b := hoggingTee(20, 60)
	b.Section.FlangeThickness = in(6)
	c = cover(b, flangeRow(beam.Top, 2, "#8", 7))
	require.Equal(t, beam.Pass, c.Outcome)

	// An isolated tee of 24 in: the bar 4.375 in. beyond the web has 6 - 4.375 -
	// 0.5 = 1.125 in. to the end; a slab goes on.
	b.Section.FlangeWidth = in(24)
	require.Equal(t, beam.Pass, cover(b, flangeRow(beam.Top, 2, "#8", 7)).Outcome)
	b.Section.Isolated = true
	c = cover(b, flangeRow(beam.Top, 2, "#8", 7))
	require.InDelta(t, 1.125, valueIn(t, c.Capacity, "in"), 1e-9)
	require.Equal(t, beam.Fail, c.Outcome)
}

// A single bar nearest a wide tension face: 24.3.3 goes by the width of that
// face, here the flange's.
func TestSingleBarUnderAWideFace(t *testing.T) {
	b := demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(-20)})
	b.Section = beam.Section{Shape: beam.Tee, Width: in(8), Depth: in(20), FlangeThickness: in(4), FlangeWidth: in(14)}
	r, _ := check(t, ACI31819(), b, []beam.Row{bottom(2, "#5"), top(1, "#8")})
	c := find1(t, r, "crack.single-bar")
	require.InDelta(t, 14, valueIn(t, c.Demand, "in"), 1e-9)
	require.Equal(t, beam.Fail, c.Outcome)
}

// Judging a tee with bars in its flange allocates nothing.
func TestJudgingATeeAllocatesNothing(t *testing.T) {
	_, trial := check(t, ACI31819(), hoggingTee(20, 60), []beam.Row{bottom(2, "#5"), top(4, "#8"), flangeRow(beam.Top, 4, "#8", 5)})
	trial.Record = false
	var dst []beam.Check
	for _, g := range []beam.Group{beam.Fitting, beam.Bending} {
		dst = ACI31819().Judge(dst[:0], g, trial)
		require.Zero(t, testing.AllocsPerRun(50, func() { dst = ACI31819().Judge(dst[:0], g, trial) }))
	}
}
