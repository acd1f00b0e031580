package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/units"
)

// The SI catalog's name of each inch size used here.
var softMetric = map[string]string{"#3": "No. 10", "#4": "No. 13", "#5": "No. 16", "#6": "No. 19", "#8": "No. 25", "#9": "No. 29", "#11": "No. 36", "#18": "No. 57"}

func sizeOf(t testing.TB, catalog, name string) bars.Size {
	t.Helper()
	c, err := bars.Lookup(catalog)
	require.NoError(t, err)
	s, err := c.Size(name)
	require.NoError(t, err)
	return s
}

// Both catalogs of ASTM bars carry the bar's number in their diameter.
func TestBarNumber(t *testing.T) {
	for _, id := range []string{"astm-inch", "astm-metric"} {
		c, err := bars.Lookup(id)
		require.NoError(t, err)
		var numbers []int
		for _, s := range c.Sizes() {
			numbers = append(numbers, barNumber(s.Diameter))
		}
		require.Equal(t, []int{3, 4, 5, 6, 7, 8, 9, 10, 11, 14, 18}, numbers, id)
	}
}

// Table 20.5.1.3.1 of 318-19 (20.6.1.3.1 of 318-14), its rows for beams.
func TestCoverByExposureAndSize(t *testing.T) {
	for _, c := range []struct {
		exposure beam.Exposure
		bar      string
		in, mm   float64
	}{
		{beam.Interior, "#4", 1.5, 40},
		{beam.Interior, "#11", 1.5, 40},
		{beam.Weather, "#5", 1.5, 40},
		{beam.Weather, "#6", 2, 50},
		{beam.Weather, "#18", 2, 50},
		{beam.Ground, "#3", 3, 75},
		{beam.Ground, "#18", 3, 75},
	} {
		us, si := sizeOf(t, "astm-inch", c.bar), sizeOf(t, "astm-metric", softMetric[c.bar])
		for _, e := range []*edition{&us14, &us19} {
			require.InEpsilon(t, c.in, e.leastCover(c.exposure, &us).In(units.Inch), 1e-12, "%s %s %s", e.id, c.exposure, c.bar)
		}
		for _, e := range []*edition{&si14, &si19} {
			require.InEpsilon(t, c.mm, e.leastCover(c.exposure, &si).In(units.Millimetre), 1e-12, "%s %s %s", e.id, c.exposure, c.bar)
		}
	}
}

// Stirrup and bar each need the cover of their own size: an exposed beam with
// No. 4 stirrups needs 1.5 in. to them and 2 in. to No. 6 bars and larger.
func TestCoverSatisfiesStirrupAndBar(t *testing.T) {
	for _, c := range []struct {
		exposure     beam.Exposure
		stirrup, bar string
		want         float64
	}{
		{beam.Interior, "#4", "#9", 1.5},
		{beam.Weather, "#4", "#9", 1.5},   // 2 - 0.5
		{beam.Weather, "#3", "#9", 1.625}, // 2 - 0.375
		{beam.Weather, "#3", "#5", 1.5},
		{beam.Weather, "#6", "#9", 2}, // the stirrup's own
		{beam.Ground, "#4", "#9", 3},
		{beam.Weather, "", "#9", 2},
	} {
		p := &beam.Problem{}
		p.Brief.Exposure = c.exposure
		var tie bars.Size
		if c.stirrup != "" {
			tie = sizeOf(t, "astm-inch", c.stirrup)
		}
		got := ACI31819().Cover(p, tie, sizeOf(t, "astm-inch", c.bar))
		require.InEpsilon(t, c.want, got.In(units.Inch), 1e-12, "%s %s in %s", c.exposure, c.bar, c.stirrup)
	}
}

func TestCoverChecks(t *testing.T) {
	exposed := func(b *beam.Brief) { b.Exposure = beam.Weather }
	tr := shearTrial(t, ACI31819(), exposed)
	require.InEpsilon(t, 1.625, tr.Cover.In(units.Inch), 1e-12)
	checks := us19.judgeFitting(nil, tr)
	require.Equal(t, beam.Pass, only(t, checks, "cover.stirrup").Outcome)
	for _, c := range checksOf(checks, "cover.bar") {
		require.Equal(t, beam.Pass, c.Outcome, c.Face)
		require.InEpsilon(t, 1, c.Utilization, 1e-9, "the cover is just that of the bars")
	}

	tr.Side = beam.SideSteel{Size: sizeOf(t, "astm-inch", "#6"), Each: 2, Spacing: units.Inch.Of(8), TensionFace: beam.Bottom}
	tr.Record = true
	side := checksOf(us19.judgeFitting(nil, tr), "cover.bar")[2]
	require.Equal(t, beam.Side, side.Face)
	require.InEpsilon(t, 1, side.Utilization, 1e-9)
	requireEvaluable(t, &side)

	// The bars stay where they are, and the ground asks for 3 in.
	tr.Brief.Exposure = beam.Ground
	checks = us19.judgeFitting(nil, tr)
	require.Equal(t, beam.Fail, only(t, checks, "cover.stirrup").Outcome)
	require.Equal(t, beam.Fail, checksOf(checks, "cover.bar")[0].Outcome)

	// A cover of the brief that is enough for the stirrups does not excuse bars
	// that it leaves with too little.
	tr = shearTrial(t, ACI31819(), exposed)
	tr.Cover, tr.Brief.Cover = units.Inch.Of(1.5), units.Inch.Of(1.5)
	for i := range tr.Bottom.Fit.Bars {
		tr.Bottom.Fit.Bars[i].Y = tr.Bottom.Fit.Bars[i].Y.Sub(units.Inch.Of(0.125))
	}
	checks = us19.judgeFitting(nil, tr)
	require.Equal(t, beam.Pass, only(t, checks, "cover.stirrup").Outcome)
	bottom := checksOf(checks, "cover.bar")[0]
	require.Equal(t, beam.Fail, bottom.Outcome)
	require.InEpsilon(t, 1.875, valueIn(t, bottom.Capacity, "in"), 1e-9)

	// One below the table's for the stirrups is the engineer's decision: it is
	// not judged, and stands among what only the engineer can confirm.
	tr.Cover, tr.Brief.Cover = units.Inch.Of(1.25), units.Inch.Of(1.25)
	checks = us19.judgeFitting(nil, tr)
	require.Equal(t, beam.NotJudged, only(t, checks, "cover.stirrup").Outcome)
	require.Equal(t, noteOwnCover, only(t, checks, "cover.stirrup").Reason)
	require.Equal(t, beam.NotJudged, checksOf(checks, "cover.bar")[0].Outcome)
	var note beam.Register
	us19.settleCover(tr, &note)
	require.Len(t, note.All(), 1)
	require.True(t, note.All()[0].Open)
}

// 25.2.1: 1 in., db, 4/3 of the aggregate; 25.2.2: 1 in. between layers, and
// 4/3 of the aggregate there too, by the 3/4 of 26.4.2.1(a).
func TestGaps(t *testing.T) {
	for _, c := range []struct {
		code      Code
		aggregate units.Length
		beside    units.Length
		between   units.Length
	}{
		{ACI31819(), units.Inch.Of(0.75), units.Inch.Of(1), units.Inch.Of(1)}, // 4/3 × 3/4 = 1
		{ACI31819(), units.Inch.Of(1.5), units.Inch.Of(2), units.Inch.Of(2)},
		{ACI31814(), units.Inch.Of(0.375), units.Inch.Of(1), units.Inch.Of(1)},
		{ACI31819M(), units.Millimetre.Of(18), units.Millimetre.Of(25), units.Millimetre.Of(25)},
		{ACI31814M(), units.Millimetre.Of(30), units.Millimetre.Of(40), units.Millimetre.Of(40)},
	} {
		p := &beam.Problem{}
		p.Brief.Concrete.Aggregate = c.aggregate
		g := c.code.Gaps(p)
		require.InEpsilon(t, c.beside.In(units.Inch), g.InLayer.Least.In(units.Inch), 1e-12)
		require.InEpsilon(t, c.between.In(units.Inch), g.BetweenLayers.Least.In(units.Inch), 1e-12)
		require.Equal(t, 1.0, g.InLayer.Diameters)
		require.Zero(t, g.BetweenLayers.Diameters)
	}
}

// The clear distances come from coordinates. Own calculation: bars seated in a
// No. 3 stirrup of bend radius 0.75 in. have their corner centres at 1.5 +
// 0.375 + max(0.75, db/2) in. from the side.
func TestClearDistances(t *testing.T) {
	for _, c := range []struct {
		n         int
		size      string
		aggregate float64
		clear     float64
		need      float64
		want      beam.Outcome
	}{
		{4, "#8", 0.75, (14-2*2.625)/3 - 1, 1, beam.Pass},
		{5, "#8", 0.75, (14-2*2.625)/4 - 1, 1, beam.Pass},
		{6, "#8", 0.75, (14-2*2.625)/5 - 1, 1, beam.Fail},
		{5, "#8", 1, (14-2*2.625)/4 - 1, 4.0 / 3, beam.Fail},
		{4, "#11", 0.75, (14-2*2.625)/3 - 1.41, 1.41, beam.Pass}, // 1.5067 > 1.41
		{5, "#10", 0.75, (14-2*2.625)/4 - 1.27, 1.27, beam.Fail},
	} {
		b := usBrief()
		b.Concrete.Aggregate = units.Inch.Of(c.aggregate)
		tr := trialOf(t, problemOf(t, ACI31819(), b), "#3", []group{{c.n, c.size}}, []group{{2, "#6"}})
		tr.Record = true
		got := checksOf(us19.judgeFitting(nil, tr), "spacing.clear")[0]
		require.Equal(t, c.want, got.Outcome, "%d %s", c.n, c.size)
		require.InEpsilon(t, c.clear, valueIn(t, got.Capacity, "in"), 1e-9)
		require.InEpsilon(t, c.need, valueIn(t, got.Demand, "in"), 1e-9)
		requireEvaluable(t, &got)
	}
}

func TestSingleBarHasNoClearDistance(t *testing.T) {
	tr := trialOf(t, problemOf(t, ACI31819(), usBrief()), "#3", []group{{1, "#8"}}, []group{{2, "#6"}})
	checks := us19.judgeFitting(nil, tr)
	require.Equal(t, beam.NotApplicable, checksOf(checks, "spacing.clear")[0].Outcome)
	require.Len(t, checksOf(checks, "aggregate.clear-spacing"), 1, "the top bars'")
	require.Equal(t, beam.Fail, checksOf(checks, "bars.corners")[0].Outcome, "a stirrup needs a bar in both corners")
	require.Equal(t, beam.Pass, checksOf(checks, "bars.corners")[1].Outcome)
}

func TestLayers(t *testing.T) {
	p := problemOf(t, ACI31819(), usBrief())
	lay := func(groups ...group) []beam.Check {
		return us19.judgeFitting(nil, trialOf(t, p, "#3", groups, []group{{2, "#6"}}))
	}
	checks := lay(group{4, "#8"}, group{2, "#8"})
	got := only(t, checks, "spacing.layers")
	require.Equal(t, beam.Pass, got.Outcome)
	require.InEpsilon(t, 1, got.Utilization, 1e-9)
	require.Equal(t, beam.Pass, only(t, checks, "spacing.alignment").Outcome)

	require.Equal(t, beam.Fail, only(t, lay(group{2, "#8"}, group{3, "#8"}), "spacing.alignment").Outcome, "more bars than below")
	require.Equal(t, beam.Pass, only(t, lay(group{5, "#8"}, group{3, "#8"}), "spacing.alignment").Outcome)

	// Bars pressed closer than an inch apart in height.
	tr := trialOf(t, p, "#3", []group{{4, "#8"}, {2, "#8"}}, []group{{2, "#6"}})
	for i := 4; i < 6; i++ {
		tr.Bottom.Fit.Bars[i].Y = tr.Bottom.Fit.Bars[i].Y.Sub(units.Inch.Of(0.01))
	}
	got = only(t, us19.judgeFitting(nil, tr), "spacing.layers")
	require.Equal(t, beam.Fail, got.Outcome)
	require.InEpsilon(t, 0.99, valueIn(t, got.Capacity, "in"), 1e-9)
}

// 26.4.2.1(a): aggregate up to a fifth of the form's width and three quarters
// of the least clear distance.
func TestAggregateLimits(t *testing.T) {
	for _, c := range []struct {
		aggregate, width float64
		form             beam.Outcome
	}{{2.8, 14, beam.Pass}, {2.81, 14, beam.Fail}, {2.4, 12, beam.Pass}} {
		tr := shearTrial(t, ACI31819(), nil)
		tr.Brief.Concrete.Aggregate, tr.Brief.Section.Width = units.Inch.Of(c.aggregate), units.Inch.Of(c.width)
		require.Equal(t, c.form, only(t, us19.judgeFitting(nil, tr), "aggregate.form-width").Outcome)
	}
	tr := shearTrial(t, ACI31819(), nil) // clear distance 1.1875 in., × 3/4 = 0.890625
	for _, c := range []struct {
		aggregate float64
		want      beam.Outcome
	}{{0.890625, beam.Pass}, {0.8907, beam.Fail}} {
		tr.Brief.Concrete.Aggregate = units.Inch.Of(c.aggregate)
		require.Equal(t, c.want, checksOf(us19.judgeFitting(nil, tr), "aggregate.clear-spacing")[0].Outcome)
	}
}

func TestAllowedSizes(t *testing.T) {
	for _, c := range Editions() {
		for _, id := range []string{"astm-inch", "astm-metric"} {
			catalog, err := bars.Lookup(id)
			require.NoError(t, err)
			for _, s := range catalog.Sizes() {
				require.True(t, c.Allows(bars.Main, s), s.Name)
				require.Equal(t, barNumber(s.Diameter) <= 8, c.Allows(bars.Stirrup, s), s.Name)
			}
		}
		require.False(t, c.Allows(bars.Main, bars.Size{}))
		require.False(t, c.Allows(bars.Use(0), sizeOf(t, "astm-inch", "#5")))
	}
}

// Table 24.3.2, with the cover to the longitudinal bar (not 0.6 fy, not the cover
// to the stirrup). Own calculations from the clause.
func TestGreatestCrackSpacing(t *testing.T) {
	for _, c := range []struct {
		e      *edition
		fs, cc float64
		want   float64
	}{
		{&us19, 40000, 2, 10},
		{&us14, 40000, 1.2, 12},       // 15 - 3 = 12: both terms
		{&us19, 40000, 1, 12},         // the upper bound 12 (40,000/fs)
		{&us19, 36000, 2, 15/0.9 - 5}, // 11.667
		{&us19, 40000, 7, 0},          // so much cover leaves none
		{&si19, 280, 50, 255},
		{&si14, 280, 32, 300},
		{&si19, 280, 20, 300},
	} {
		got := c.e.crackSpacing(c.e.stressOf(c.fs), c.e.lengthOf(c.cc))
		require.InDelta(t, c.want, c.e.lengthIn(got), 1e-9, "%s fs = %g, cc = %g", c.e.id, c.fs, c.cc)
	}
	require.InEpsilon(t, 40000, us19.stressIn(us19.crackStress(units.KSI.Of(60))), 1e-12)
}

// 9.7.2.3: needed above 36 in. (900 mm), over half the depth.
func TestSideFaceBars(t *testing.T) {
	deep := func(h float64) *beam.Trial {
		return shearTrial(t, ACI31819(), func(b *beam.Brief) {
			b.Section.Depth, b.Spans[0] = units.Inch.Of(h), units.Foot.Of(30)
		})
	}
	require.Equal(t, beam.NotApplicable, only(t, us19.judgeWhole(nil, deep(36)), "side-face.spacing").Outcome)

	// h = 48 in.: mid-depth 24 in., bars nearest the face at 2.375 in., limit
	// 15 - 2.5 × 1.875 = 10.3125 in.
	for _, c := range []struct {
		each    int
		spacing float64
		gap     float64
		want    beam.Outcome
	}{
		{0, 0, 24 - 2.375, beam.Fail},
		{1, 10, 24 - 12.375, beam.Fail}, // 11.6 in. left to mid-depth
		{2, 10, 10, beam.Pass},
		{2, 10.3125, 10.3125, beam.Pass},
		{2, 10.4, 10.4, beam.Fail},
		{2, 7, 24 - 16.375, beam.Pass},
		{2, 5, 24 - 12.375, beam.Fail},
		{3, 5, 24 - 17.375, beam.Pass},
	} {
		tr := deep(48)
		tr.Record = true
		tr.Side = beam.SideSteel{Size: sizeOf(t, "astm-inch", "#4"), Each: c.each, Spacing: units.Inch.Of(c.spacing), TensionFace: beam.Bottom}
		got := only(t, us19.judgeWhole(nil, tr), "side-face.spacing")
		require.Equal(t, beam.Bottom, got.Face)
		require.Equal(t, c.want, got.Outcome, "%d at %g", c.each, c.spacing)
		require.InEpsilon(t, c.gap, valueIn(t, got.Demand, "in"), 1e-9)
		require.InEpsilon(t, 10.3125, valueIn(t, got.Capacity, "in"), 1e-9)
		requireEvaluable(t, &got)
	}

	// Demands of either sense ask for bars from their own tension face.
	b := demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(-200)})
	b.Section.Depth = units.Inch.Of(48)
	hog := trialOf(t, problemOf(t, ACI31819(), b), "#3", []group{{3, "#8"}}, []group{{3, "#8"}})
	require.Equal(t, beam.Top, only(t, us19.judgeWhole(nil, hog), "side-face.spacing").Face)

	// Bars counted from the bottom serve a top face in tension only where they
	// reach it: top bars at 2.25 in., the fourth bar at 42.375 in. from the
	// bottom is 5.625 in. from the top.
	tr := deep(48)
	tr.Side = beam.SideSteel{Size: sizeOf(t, "astm-inch", "#4"), Each: 4, Spacing: units.Inch.Of(10), TensionFace: beam.Bottom}
	require.InEpsilon(t, 10, sideGap(tr, beam.Top).In(units.Inch), 1e-9)
	tr.Side.Each = 2 // the highest is 25.625 in. from the top: beyond mid-depth
	require.InEpsilon(t, 25.625-2.25, sideGap(tr, beam.Top).In(units.Inch), 1e-9)
}

// 9.7.6.4 for No. 6 bars relied on in compression inside No. 3 stirrups: 16 ×
// 0.75 = 12 in., 48 × 0.375 = 18 in., least side 14 in.
func TestTiesOfCompressionBars(t *testing.T) {
	p := problemOf(t, ACI31819(), usBrief())
	relied := func(tie string, bars group, legs int, spacing float64) []beam.Check {
		tr := trialOf(t, p, tie, []group{{5, "#8"}}, []group{bars})
		tr.Top.InCompression = true
		tr.Record = true
		if spacing > 0 {
			addZone(tr, legs, spacing, 6, 258)
		}
		return us19.judgeTies(nil, tr)
	}
	require.Empty(t, us19.judgeTies(nil, shearTrial(t, ACI31819(), nil)), "bars that only hold stirrups need no ties")

	for _, c := range []struct {
		spacing float64
		want    beam.Outcome
	}{{12, beam.Pass}, {12.01, beam.Fail}} {
		got := only(t, relied("#3", group{2, "#6"}, 2, c.spacing), "ties.spacing")
		require.Equal(t, c.want, got.Outcome)
		require.InEpsilon(t, 12, valueIn(t, got.Capacity, "in"), 1e-9)
		requireEvaluable(t, &got)
	}
	// 16 × 1.41 = 22.6 in., 48 × 0.375 = 18 in.: the width governs.
	require.InEpsilon(t, 14, valueIn(t, only(t, relied("#3", group{2, "#11"}, 2, 8), "ties.spacing").Capacity, "in"), 1e-9)
	require.Equal(t, beam.Fail, only(t, relied("#3", group{2, "#6"}, 2, 0), "ties.spacing").Outcome, "no stirrups")

	for _, c := range []struct {
		tie, bar string
		want     beam.Outcome
	}{{"#3", "#10", beam.Pass}, {"#3", "#11", beam.Fail}, {"#4", "#11", beam.Pass}} {
		require.Equal(t, c.want, only(t, relied(c.tie, group{2, c.bar}, 2, 8), "ties.size").Outcome, "%s in %s", c.bar, c.tie)
	}

	// Corner and alternate bars in a corner, none more than 6 in. clear from
	// one. Clear distance of 3 bars: (14 - 5.25)/2 - 0.75 = 3.625 in.
	for _, c := range []struct {
		n, legs int
		want    beam.Outcome
	}{{2, 2, beam.Pass}, {3, 2, beam.Pass}, {4, 2, beam.Fail}, {4, 3, beam.Pass}, {5, 2, beam.Fail}, {5, 3, beam.Pass}, {6, 3, beam.Fail}, {6, 4, beam.Pass}} {
		require.Equal(t, c.want, only(t, relied("#3", group{c.n, "#6"}, c.legs, 8), "ties.held-bars").Outcome, "%d bars, %d legs", c.n, c.legs)
	}
	b := usBrief()
	b.Section.Width = units.Inch.Of(24)
	wide := trialOf(t, problemOf(t, ACI31819(), b), "#3", []group{{5, "#8"}}, []group{{3, "#6"}})
	wide.Top.InCompression = true
	addZone(wide, 2, 8, 6, 258)
	got := only(t, us19.judgeTies(nil, wide), "ties.held-bars")
	require.Equal(t, beam.Fail, got.Outcome)
	require.InEpsilon(t, (24-5.25)/2-0.75, valueIn(t, got.Demand, "in"), 1e-9)
	wide.Zones[0].Legs = 3
	require.Equal(t, beam.Pass, only(t, us19.judgeTies(nil, wide), "ties.held-bars").Outcome)

	// Bars of an inner layer between the legs are in no corner.
	inner := trialOf(t, p, "#3", []group{{5, "#8"}}, []group{{3, "#6"}, {3, "#6"}})
	inner.Top.InCompression = true
	addZone(inner, 3, 8, 6, 258)
	require.Equal(t, beam.Fail, only(t, us19.judgeTies(nil, inner), "ties.held-bars").Outcome)
	inner = trialOf(t, p, "#3", []group{{5, "#8"}}, []group{{3, "#6"}, {2, "#6"}})
	inner.Top.InCompression = true
	addZone(inner, 3, 8, 6, 258)
	require.Equal(t, beam.Pass, only(t, us19.judgeTies(nil, inner), "ties.held-bars").Outcome)

	// A single bar of an inner layer stands in the middle, held by nothing.
	inner = trialOf(t, p, "#3", []group{{5, "#8"}}, []group{{3, "#6"}, {1, "#6"}})
	inner.Top.InCompression = true
	addZone(inner, 3, 8, 6, 258)
	require.Equal(t, beam.Fail, only(t, us19.judgeTies(nil, inner), "ties.held-bars").Outcome)

	// Open stirrups do not tie, and a length without stirrups leaves bars untied.
	tr := shearTrial(t, ACI31819(), nil)
	tr.Top.InCompression = true
	addZone(tr, 2, 8, 6, 230)
	require.Equal(t, beam.Pass, only(t, us19.judgeTies(nil, tr), "ties.form").Outcome)
	gap := only(t, us19.judgeTies(nil, tr), "ties.spacing")
	require.Equal(t, beam.Fail, gap.Outcome)
	// 28 in. to the face, and half a spacing back to the last stirrup.
	require.InEpsilon(t, 28+4, valueIn(t, gap.Demand, "in"), 1e-9)
	// Across a gap between zones what counts is the distance of the stirrups.
	tr = shearTrial(t, ACI31819(), nil)
	tr.Top.InCompression = true
	addZone(tr, 2, 8, 6, 126)
	addZone(tr, 2, 8, 132.9, 258)
	gap = only(t, us19.judgeTies(nil, tr), "ties.spacing")
	require.InEpsilon(t, 4+6.9+4, valueIn(t, gap.Demand, "in"), 1e-9)
	tr.Zones[0].Form = "open"
	require.Equal(t, beam.Fail, only(t, us19.judgeTies(nil, tr), "ties.form").Outcome)
}
