package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/units"
)

// bundled is a row of bars in contact.
func bundled(row beam.Row, of int) beam.Row {
	row.Bundled = of
	return row
}

// facesOf are the checks of an id at a face.
func facesOf(checks []beam.Check, id string, face beam.Face) []beam.Check {
	var out []beam.Check
	for _, c := range checksOf(checks, id) {
		if c.Face == face {
			out = append(out, c)
		}
	}
	return out
}

// 25.6.1: at most four bars, of No. 11 at most, inside stirrups. Package bars
// lays no more than four.
func TestLimitsOfBundles(t *testing.T) {
	demand := beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)}
	wide := func(b *beam.Brief) { b.Section.Width = in(24) }
	for _, tc := range []struct {
		bar  string
		of   int
		size beam.Outcome
	}{
		{"#9", 2, beam.Pass}, {"#11", 3, beam.Pass}, {"#14", 2, beam.Fail}, {"#8", 4, beam.Pass},
	} {
		r, _ := checkUS(t, ACI31819(), []beam.Row{bundled(bottom(2*tc.of, tc.bar), tc.of), top(2, "#5")}, wide, demand)
		require.Equal(t, tc.size, find1(t, r, "bundles.size").Outcome, tc.bar)
		c := find1(t, r, "bundles.bars")
		require.Equal(t, float64(tc.of), c.Demand.SI())
		require.Equal(t, 4.0, c.Capacity.SI())
		require.Equal(t, beam.Pass, c.Outcome)
		require.Equal(t, beam.Pass, find1(t, r, "bundles.enclosed").Outcome)
		require.Equal(t, beam.Bottom, find1(t, r, "bundles.enclosed").Face)
	}
	r, _ := checkUS(t, ACI31819(), []beam.Row{bottom(4, "#9"), top(2, "#5")}, wide, demand)
	require.Empty(t, checksOf(r.Checks, "bundles.size"))
	_, trial := checkUS(t, ACI31819(), []beam.Row{bundled(bottom(4, "#9"), 2), top(2, "#5")}, wide, demand)
	trial.Stirrup = bars.Size{}
	require.Equal(t, beam.Fail, only(t, ACI31819().e.appendBundles(nil, trial, beam.Bottom), "bundles.enclosed").Outcome)
	require.Empty(t, ACI31819().e.appendBundles(nil, trial, beam.Top))
}

// Bundles are spaced by the diameter of one bar of their area (25.6.1.6): two #9
// count with √2 × 1.128 = 1.5952 in, three with 1.9538 in.
func TestSpacingOfBundles(t *testing.T) {
	for of, want := range map[int]float64{2: math.Sqrt2 * 1.128, 3: math.Sqrt(3) * 1.128} {
		r, _ := checkUS(t, ACI31819(), []beam.Row{bundled(bottom(2*of, "#9"), of), top(2, "#5")},
			func(b *beam.Brief) { b.Section.Width = in(20) }, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
		c := facesOf(r.Checks, "spacing.clear", beam.Bottom)[0]
		require.InEpsilon(t, want, valueIn(t, c.Demand, "in"), 1e-9)
		requireEvaluable(t, &c)
	}
}

// Cover of bundles (20.5.1.3.5; 20.6.1.3.4 in 318-14): their equivalent diameter,
// but no more than 2 in, and what their own bars need. Against ground 3 in. as ever.
func TestCoverOfBundles(t *testing.T) {
	size := func(bar string, of int) *bars.Size {
		s := sizeOf(t, "astm-inch", bar)
		b, err := bars.Bundle(s, of)
		require.NoError(t, err)
		return &b
	}
	for _, tc := range []struct {
		bar      string
		of       int
		exposure beam.Exposure
		us       float64
	}{
		{"#8", 2, beam.Interior, 1.5},                // √2 = 1.414 in: the table governs
		{"#9", 2, beam.Interior, math.Sqrt2 * 1.128}, // 1.595 in
		{"#8", 3, beam.Interior, math.Sqrt(3)},       // 1.732 in
		{"#11", 2, beam.Interior, 1.41 * math.Sqrt2}, // 1.994 in
		{"#9", 4, beam.Interior, 2},                  // 2.256 in, capped
		{"#5", 4, beam.Weather, 1.5},                 // the table by the bars, which are small: 1.25 in
		{"#6", 2, beam.Weather, 2},                   // and by larger ones: 1.061 in
		{"#9", 4, beam.Ground, 3},
	} {
		for _, c := range []Code{ACI31814(), ACI31819()} {
			require.InDelta(t, tc.us, c.e.leastCover(tc.exposure, size(tc.bar, tc.of)).In(units.Inch), 1e-9, "%dx%s", tc.of, tc.bar)
		}
	}
	for _, c := range []Code{ACI31814M(), ACI31819M()} {
		require.InDelta(t, 50, c.e.leastCover(beam.Interior, size("#9", 4)).In(units.Millimetre), 1e-9)
		require.InDelta(t, 75, c.e.leastCover(beam.Ground, size("#9", 4)).In(units.Millimetre), 1e-9)
	}
	r, _ := checkUS(t, ACI31819(), []beam.Row{bundled(bottom(8, "#9"), 4), top(2, "#5")},
		func(b *beam.Brief) { b.Section.Width, b.Cover = in(20), in(1.5) }, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	c := facesOf(r.Checks, "cover.bar", beam.Bottom)[0]
	require.InEpsilon(t, 2, valueIn(t, c.Demand, "in"), 1e-9)
	require.InEpsilon(t, 1.875, valueIn(t, c.Capacity, "in"), 1e-9, "to the real bars")
	require.Equal(t, beam.Fail, c.Outcome)
	require.Equal(t, "Table 20.5.1.3.1, 20.5.1.3.5", c.Clause)
}

// Bundles relied on in compression have ties of No. 4, and spacings by a single
// bar: 16 × 1 in.
func TestTiesOfBundles(t *testing.T) {
	for of, want := range map[int]float64{1: 3, 2: 4} {
		relied := top(4, "#8")
		relied.InCompression = true
		r, _ := checkUS(t, ACI31819(), []beam.Row{bottom(4, "#9"), bundled(relied, of)},
			func(b *beam.Brief) { b.Section.Width = in(20) }, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
		require.Equal(t, want, find1(t, r, "ties.size").Demand.SI())
		require.InEpsilon(t, 16, valueIn(t, find1(t, r, "ties.spacing").Capacity, "in"), 1e-9)
	}
}

// The code lets the search bundle bars of No. 11 at most.
func TestAllowedBundles(t *testing.T) {
	for bar, want := range map[string]bool{"#3": true, "#11": true, "#14": false} {
		b, err := bars.Bundle(sizeOf(t, "astm-inch", bar), 4)
		require.NoError(t, err)
		require.Equal(t, want, ACI31819().Allows(bars.Main, b), bar)
		require.False(t, ACI31819().Allows(bars.Stirrup, b))
	}
	b, err := bars.Bundle(sizeOf(t, "astm-inch", "#11"), 2)
	require.NoError(t, err)
	require.True(t, ACI31819().Allows(bars.Main, b), "by the bars, not by the 1.99 in. of the bundle")
}

// 26.4.2.1(a): the web between its forms, a wall beside a hollow, a third of a slab.
func TestLargestStone(t *testing.T) {
	largest := func(s beam.Section) float64 {
		b := demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
		b.Section = s
		r, _ := check(t, ACI31819(), b, []beam.Row{bottom(2, "#8"), top(2, "#5")})
		return valueIn(t, find1(t, r, "aggregate.form-width").Capacity, "in")
	}
	tee := beam.Section{Shape: beam.Tee, Width: in(12), Depth: in(24), FlangeThickness: in(4), FlangeWidth: in(40)}
	require.InEpsilon(t, 4.0/3, largest(tee), 1e-9)
	tee.FlangeThickness = in(9)
	require.InEpsilon(t, 12.0/5, largest(tee), 1e-9)
	tee.Shape, tee.FlangeThickness = beam.InvertedTee, in(4)
	require.InEpsilon(t, 12.0/5, largest(tee), 1e-9)
	box := polygonOf([2]float64{0, 0}, [2]float64{24, 0}, [2]float64{24, 30}, [2]float64{0, 30})
	for _, tc := range []struct{ left, bottom, right, top, want float64 }{
		{5, 6, 18, 24, 5}, {6, 6, 19, 24, 5}, {6, 5, 18, 24, 5}, {6, 6, 18, 25, 5}, {7, 7, 17, 23, 7},
	} {
		box.Voids = [][]beam.Point{{{X: in(tc.left), Y: in(tc.bottom)}, {X: in(tc.right), Y: in(tc.bottom)}, {X: in(tc.right), Y: in(tc.top)}, {X: in(tc.left), Y: in(tc.top)}}}
		require.InEpsilon(t, tc.want/5, largest(box), 1e-9)
	}
	trapezoid := polygonOf([2]float64{5, 0}, [2]float64{15, 0}, [2]float64{20, 24}, [2]float64{0, 24})
	require.InEpsilon(t, 10.0/5, largest(trapezoid), 1e-9)
}

// Bars along the sides of a polygon whose sides are not the strip's are left to
// the engineer; those of one with upright sides are judged.
func TestSideFacesOfPolygons(t *testing.T) {
	outcome := func(s beam.Section) beam.Outcome {
		b := demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
		b.Section = s
		r, _ := check(t, ACI31819(), b, []beam.Row{bottom(4, "#8"), top(2, "#5")})
		return find1(t, r, "side-face.spacing").Outcome
	}
	require.Equal(t, beam.Fail, outcome(polygonOf([2]float64{0, 0}, [2]float64{16, 0}, [2]float64{16, 40}, [2]float64{0, 40})))
	require.Equal(t, beam.NotJudged, outcome(polygonOf([2]float64{2, 0}, [2]float64{18, 0}, [2]float64{20, 40}, [2]float64{0, 40})))
	require.Equal(t, beam.Fail, outcome(beam.Section{Shape: beam.Tee, Width: in(16), Depth: in(40), FlangeThickness: in(6), FlangeWidth: in(60)}))
	require.Equal(t, beam.NotApplicable, outcome(polygonOf([2]float64{2, 0}, [2]float64{18, 0}, [2]float64{20, 36}, [2]float64{0, 36})))
}

// Side bars count by the strains they have where the brief says so: 2 × 0.31 in2
// at 24 in. from the top of 40 in. and so on add to the strength; and the bound of
// the search lets them.
func TestSideBarsThatCount(t *testing.T) {
	side := beam.Row{Mark: "S", Bar: "#5", Count: 2, Face: beam.Side, Spacing: in(9)}
	strength := func(count bool) float64 {
		b := demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(300)})
		b.Section = rectangle(in(16), in(40))
		b.Readings.CountSideBars = count
		r, trial := check(t, ACI31819(), b, []beam.Row{bottom(4, "#8"), top(2, "#5"), side})
		requireEvaluable(t, find1(t, r, "flexure.positive"))
		bound, ok := ACI31819().LeastTension(trial.Problem, beam.Positive, in(37))
		require.True(t, ok)
		require.Equal(t, count, bound.IsZero())
		return valueIn(t, find1(t, r, "flexure.positive").Capacity, "kip-ft")
	}
	bare, with := strength(false), strength(true)
	// Both pairs yield: a = (3.16 + 1.24) × 60/54.4, at 37.625 - 9 and - 18 in.
	d := 40 - 1.5 - 0.375 - 0.5
	a := 4.4 * 60 / 54.4
	require.InEpsilon(t, 0.9*(3.16*60*d+0.62*60*(d-9)+0.62*60*(d-18)-4.4*60*a/2)/12, with, 1e-9)
	require.InEpsilon(t, 0.9*3.16*60*(d-3.16*60/54.4/2)/12, bare, 1e-9)
	// No deeper than 36 in. the search lays none, and the bound holds.
	b := demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(300)})
	b.Section, b.Readings.CountSideBars = rectangle(in(16), in(36)), true
	bound, _ := ACI31819().LeastTension(problemOf(t, ACI31819(), b), beam.Positive, in(33))
	require.False(t, bound.IsZero())
	_, said := resolved(t, ACI31819(), b)
	require.Contains(t, said, "reading.side-bars")
}
