package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/units"
)

// Bars beyond No. 18 are not of Table 20.2.1.3.
func TestNoBarBeyondNo18(t *testing.T) {
	for n, want := range map[float64]bool{2: false, 3: true, 18: true, 19: false} {
		require.Equal(t, want, ACI31819().Allows(bars.Main, bars.Size{Diameter: units.Inch.Of(n / 8)}), n)
	}
}

// moveBar puts a bar of the bottom where it is told, in inches.
func moveBar(tr *beam.Trial, bar int, x, y float64) {
	b := &tr.Bottom.Fit.Bars[bar]
	b.X, b.Y = units.Inch.Of(x), units.Inch.Of(y)
}

// Of the pairs of a layer that counts which has least to spare, by its own
// diameter (25.2.1), wherever it stands in the row.
func TestClosestPairOfALayer(t *testing.T) {
	p := problemOf(t, ACI31819(), usBrief())
	eleven := sizeOf(t, "astm-inch", "#11")
	for _, c := range []struct {
		name        string
		xs          [4]float64
		large       int // the bar that is a No. 11
		clear, need float64
	}{
		{"first pair", [4]float64{2.5, 4.5, 8, 12}, 3, 1, 1},
		{"pair in the middle", [4]float64{2.5, 5.8, 8, 11.5}, 0, 1.2, 1},
		{"last pair", [4]float64{2.5, 6.5, 9.5, 11.5}, 0, 1, 1},
		// 1.6 in. beside a No. 11 leave less than 1.3 in. between No. 8.
		{"pair of the larger bar, on its left", [4]float64{2.5, 4.8, 8, 10.805}, 3, 1.6, 1.41},
		{"pair of the larger bar, on its right", [4]float64{2.5, 5.305, 8.5, 10.8}, 0, 1.6, 1.41},
	} {
		t.Run(c.name, func(t *testing.T) {
			tr := trialOf(t, p, "#3", []group{{4, "#8"}}, []group{{2, "#6"}})
			for i, x := range c.xs {
				moveBar(tr, i, x, 2.5)
			}
			tr.Bottom.Fit.Bars[c.large].Size = eleven
			got := checksOf(us19.judgeFitting(nil, tr), "spacing.clear")[0]
			require.InEpsilon(t, c.clear, valueIn(t, got.Capacity, "in"), 1e-9)
			require.InEpsilon(t, c.need, valueIn(t, got.Demand, "in"), 1e-9)
		})
	}
}

// The clear distance of layers (25.2.2) is that from the highest edge of a bar of
// the lower to the lowest edge of one of the upper, whichever bars they are.
func TestClearDistanceOfLayers(t *testing.T) {
	p := problemOf(t, ACI31819(), usBrief())
	for _, c := range []struct {
		name string
		edit func(tr *beam.Trial)
		want float64
	}{
		{"as laid", func(*beam.Trial) {}, 1},
		{"last bar below raised", func(tr *beam.Trial) { moveBar(tr, 2, 11.375, 2.375+0.2) }, 0.8},
		{"first bar below raised", func(tr *beam.Trial) { moveBar(tr, 0, 2.625, 2.375+0.2) }, 0.8},
		{"last bar above lowered", func(tr *beam.Trial) { moveBar(tr, 5, 11.375, 4.375-0.3) }, 0.7},
		{"first bar above lowered", func(tr *beam.Trial) { moveBar(tr, 3, 2.625, 4.375-0.3) }, 0.7},
		{"bar above raised", func(tr *beam.Trial) { moveBar(tr, 4, 7, 4.375+0.5) }, 1},
		{"larger bar below", func(tr *beam.Trial) { tr.Bottom.Fit.Bars[1].Size = sizeOf(t, "astm-inch", "#11") }, 1 - 0.205},
	} {
		t.Run(c.name, func(t *testing.T) {
			tr := trialOf(t, p, "#3", []group{{3, "#8"}, {3, "#8"}}, []group{{2, "#6"}})
			c.edit(tr)
			got := only(t, us19.judgeFitting(nil, tr), "spacing.layers")
			require.InEpsilon(t, c.want, valueIn(t, got.Capacity, "in"), 1e-9)
		})
	}
}

// Three layers: the closer pair of neighbours counts.
func TestClearDistanceOfThreeLayers(t *testing.T) {
	for _, c := range []struct{ second, third, want float64 }{{4.375, 6.175, 0.8}, {4.175, 6.375, 0.8}} {
		tr := trialOf(t, problemOf(t, ACI31819(), usBrief()), "#3", []group{{2, "#8"}, {2, "#8"}, {2, "#8"}}, []group{{2, "#6"}})
		for i := range 2 {
			tr.Bottom.Fit.Bars[2+i].Y, tr.Bottom.Fit.Bars[4+i].Y = units.Inch.Of(c.second), units.Inch.Of(c.third)
		}
		require.InEpsilon(t, c.want, valueIn(t, only(t, us19.judgeFitting(nil, tr), "spacing.layers").Capacity, "in"), 1e-9)
	}
}

// Aggregate passes three quarters of the least clear distance, between layers if
// that is the least or the only one (26.4.2.1(a)).
func TestAggregateBetweenLayers(t *testing.T) {
	for _, c := range []struct {
		name   string
		groups []group
		lower  float64 // of the upper layer, in.
		want   float64
	}{
		{"bars of a layer closer", []group{{5, "#8"}, {2, "#8"}}, -0.5, 1.1875 * 0.75},
		{"layers closer", []group{{3, "#8"}, {2, "#8"}}, 0, 1 * 0.75},
		{"layers pressed together", []group{{5, "#8"}, {2, "#8"}}, 0.2, 0.8 * 0.75},
		{"one bar above another", []group{{1, "#8"}, {1, "#8"}}, 0, 1 * 0.75},
	} {
		t.Run(c.name, func(t *testing.T) {
			tr := trialOf(t, problemOf(t, ACI31819(), usBrief()), "#3", c.groups, []group{{2, "#6"}})
			for i := range tr.Bottom.Fit.Bars {
				if b := &tr.Bottom.Fit.Bars[i]; b.Layer == 2 {
					b.Y = b.Y.Sub(units.Inch.Of(c.lower))
				}
			}
			got := checksOf(us19.judgeFitting(nil, tr), "aggregate.clear-spacing")[0]
			require.Equal(t, beam.Bottom, got.Face)
			require.InEpsilon(t, c.want, valueIn(t, got.Capacity, "in"), 1e-9)
		})
	}
}

// Bars of an upper layer stand directly above bars of the lower (25.2.2); a check
// that fails says so, one that passes has nothing to say.
func TestAlignmentInWords(t *testing.T) {
	p := problemOf(t, ACI31819(), usBrief())
	got := only(t, us19.judgeFitting(nil, trialOf(t, p, "#3", []group{{2, "#8"}, {3, "#8"}}, []group{{2, "#6"}})), "spacing.alignment")
	require.InEpsilon(t, 1, valueIn(t, got.Demand, ""), 1e-12)
	require.Equal(t, beam.Fail, got.Outcome)
	require.Contains(t, got.Reason, "directly above")
	got = only(t, us19.judgeFitting(nil, trialOf(t, p, "#3", []group{{3, "#8"}, {3, "#8"}}, []group{{2, "#6"}})), "spacing.alignment")
	require.Equal(t, beam.Pass, got.Outcome)
	require.Empty(t, got.Reason)
}

// A face without bars has no distances to judge.
func TestNoDistancesWithoutBars(t *testing.T) {
	tr := trialOf(t, problemOf(t, ACI31819(), usBrief()), "#3", []group{{3, "#8"}}, nil)
	checks := us19.judgeFitting(nil, tr)
	require.Equal(t, beam.Bottom, only(t, checks, "spacing.clear").Face)
	require.Equal(t, beam.Bottom, only(t, checks, "cover.bar").Face)
}

func TestClearDistanceWorking(t *testing.T) {
	tr := shearTrial(t, ACI31819(), nil)
	tr.Record = true
	got := checksOf(us19.judgeFitting(nil, tr), "spacing.clear")[0]
	requireSymbols(t, &got, "db", "dagg", "s,min", "s")
	requireEvaluable(t, &got)
}
