package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// pressedTrial is a trial 30 in. wide and deep whose top bars are relied on in
// compression.
func pressedTrial(t testing.TB, c Code, tie string, top ...group) *beam.Trial {
	t.Helper()
	b := usBrief()
	b.Section.Width, b.Section.Depth = units.Inch.Of(30), units.Inch.Of(30)
	tr := trialOf(t, problemOf(t, c, b), tie, []group{{5, "#8"}}, top)
	tr.Top.InCompression, tr.Record = true, true
	return tr
}

// 9.7.6.4.3: 16 diameters of the bar, 48 of the tie, or the least side.
func TestTieSpacingLimits(t *testing.T) {
	for _, c := range []struct {
		tie, bar string
		want     float64
	}{
		{"#3", "#8", 16},       // 16 db of 18 dst
		{"#3", "#10", 18},      // 20.3 db, 48 × 0.375
		{"#4", "#11", 22.56},   // 16 × 1.41 of 24
		{"#5", "#18", 30},      // 36.1, 30, b = h = 30
		{"#3", "#4", 16 * 0.5}, // 8
	} {
		for _, code := range Editions() {
			tr := pressedTrial(t, code, c.tie, group{2, c.bar})
			addZone(tr, 2, 8, 6, 258)
			got := only(t, code.e.judgeTies(nil, tr), "ties.spacing")
			require.InEpsilon(t, c.want, valueIn(t, got.Capacity, "in"), 1e-9, "%s in %s", c.bar, c.tie)
			require.Empty(t, got.Reason)
			requireSymbols(t, &got, "db", "dst", "b", "h", "s,max", "s")
			requireEvaluable(t, &got)
		}
	}
}

// Of zones that differ the thinnest tie, the widest spacing and the fewest legs
// count, whichever zone has them.
func TestTiesOfSeveralZones(t *testing.T) {
	for _, swap := range []bool{false, true} {
		tr := pressedTrial(t, ACI31819(), "#4", group{4, "#11"})
		thin, thick := sizeOf(t, "astm-inch", "#3"), sizeOf(t, "astm-inch", "#4")
		if swap {
			addZone(tr, 4, 9, 6, 132)
			addZone(tr, 3, 6, 132, 258)
			tr.ZoneBar[0], tr.ZoneBar[1] = thick, thin
		} else {
			addZone(tr, 3, 6, 6, 132)
			addZone(tr, 4, 9, 132, 258)
			tr.ZoneBar[0], tr.ZoneBar[1] = thin, thick
		}
		checks := us19.judgeTies(nil, tr)
		size := only(t, checks, "ties.size")
		require.Equal(t, 4.0, size.Demand.SI())
		require.Equal(t, 3.0, size.Capacity.SI())
		spacing := only(t, checks, "ties.spacing")
		require.InEpsilon(t, 18, valueIn(t, spacing.Capacity, "in"), 1e-9)
		require.InEpsilon(t, 9, valueIn(t, spacing.Demand, "in"), 1e-9)
		require.Empty(t, spacing.Reason)
		// 4 bars, 2 of them inside: 3 legs, and one inner bar in no corner.
		held := only(t, checks, "ties.held-bars")
		require.InEpsilon(t, 6, valueIn(t, held.Capacity, "in"), 1e-9)
		require.InEpsilon(t, (30-2*(1.5+0.5+1))/3-1.41, valueIn(t, held.Demand, "in"), 1e-9)
	}
}

// Bars in compression without any stirrup are held by nothing.
func TestCompressionBarsWithoutTies(t *testing.T) {
	tr := pressedTrial(t, ACI31819(), "#3", group{2, "#8"})
	checks := us19.judgeTies(nil, tr)
	size := only(t, checks, "ties.size")
	require.Equal(t, beam.Fail, size.Outcome)
	require.Zero(t, size.Capacity.SI())
	spacing := only(t, checks, "ties.spacing")
	require.Equal(t, beam.Fail, spacing.Outcome)
	require.Equal(t, float64(beam.NoCapacity), spacing.Utilization)
	require.Contains(t, spacing.Reason, "no zone")
	require.InEpsilon(t, 16, valueIn(t, spacing.Capacity, "in"), 1e-9, "of a tie that is not there nothing is asked")
	require.InEpsilon(t, 252, valueIn(t, spacing.Demand, "in"), 1e-9, "from face to face")
	require.Empty(t, spacing.Steps)
	held := only(t, checks, "ties.held-bars")
	require.Equal(t, beam.Fail, held.Outcome)
	require.Equal(t, 2.0, held.Demand.SI())
	require.Zero(t, held.Capacity.SI())

	tr = pressedTrial(t, ACI31819(), "#3", group{1, "#8"})
	addZone(tr, 2, 8, 6, 258)
	require.Len(t, us19.judgeTies(nil, tr), 4, "one bar in compression needs ties too")
	tr.Top.Count = 0
	require.Empty(t, us19.judgeTies(nil, tr))
}

// A length that no zone reaches is named where it leaves the stirrups further
// apart than any zone does.
func TestTieSpacingInWords(t *testing.T) {
	for _, c := range []struct {
		to    float64 // of the zone, before the face at 258 in.
		apart float64
		says  bool
	}{{258, 8, false}, {255, 8, false}, {250, 12, true}} {
		tr := pressedTrial(t, ACI31819(), "#3", group{2, "#8"})
		addZone(tr, 2, 8, 6, c.to)
		got := only(t, us19.judgeTies(nil, tr), "ties.spacing")
		require.InEpsilon(t, c.apart, valueIn(t, got.Demand, "in"), 1e-9)
		require.Equal(t, c.says, got.Reason != "", "%g: %s", c.to, got.Reason)
	}
}

// 9.7.6.4.1: stirrups that tie are closed, all of them.
func TestTieFormInWords(t *testing.T) {
	tr := pressedTrial(t, ACI31819(), "#3", group{2, "#8"})
	addZone(tr, 2, 8, 6, 130)
	addZone(tr, 2, 8, 130, 258)
	for open := range 3 {
		if open > 0 {
			tr.Zones[open-1].Form = "open"
		}
		got := only(t, us19.judgeTies(nil, tr), "ties.form")
		require.Equal(t, open > 0, got.Outcome == beam.Fail)
		require.Equal(t, float64(open), got.Demand.SI())
		require.Equal(t, open > 0, got.Reason != "", got.Reason)
	}
}

// 9.7.6.4.4: 6 in. clear, 150 mm in 318M, from a bar in a corner.
func TestHeldBarsLimit(t *testing.T) {
	for _, code := range Editions() {
		limit := units.Inch.Of(6)
		if code.e.system == units.SI {
			limit = units.Millimetre.Of(150)
		}
		for _, c := range []struct {
			more float64
			want beam.Outcome
		}{{0, beam.Pass}, {0.001, beam.Fail}} {
			tr := pressedTrial(t, code, "#3", group{3, "#8"})
			addZone(tr, 2, 8, 6, 258)
			row := tr.Top.Fit.Bars
			row[1].X = row[0].X.Add(limit).Add(units.Inch.Of(1 + c.more))
			row[2].X = row[1].X.Add(units.Inch.Of(3))
			got := only(t, code.e.judgeTies(nil, tr), "ties.held-bars")
			require.Equal(t, c.want, got.Outcome, "%s, %g in. more", code.e.id, c.more)
			require.InEpsilon(t, limit.In(units.Inch), valueIn(t, got.Capacity, "in"), 1e-9)
			require.Empty(t, got.Reason)
		}
	}
}

// What is held by nothing, or by too few legs, is said.
func TestHeldBarsInWords(t *testing.T) {
	held := func(legs int, top ...group) beam.Check {
		tr := pressedTrial(t, ACI31819(), "#3", top...)
		addZone(tr, legs, 8, 6, 258)
		return only(t, us19.judgeTies(nil, tr), "ties.held-bars")
	}
	got := held(3, group{4, "#6"}, group{3, "#6"})
	require.Equal(t, beam.Fail, got.Outcome)
	require.Equal(t, float64(beam.NoCapacity), got.Utilization)
	require.Contains(t, got.Reason, "inner layer")
	got = held(2, group{4, "#6"})
	require.Equal(t, beam.Fail, got.Outcome)
	require.Contains(t, got.Reason, "alternate bars")
	require.Equal(t, 3.0, got.Demand.SI())
	require.Equal(t, 2.0, got.Capacity.SI())
	require.Empty(t, held(4, group{4, "#6"}).Reason)
	require.True(t, held(4, group{4, "#6"}).Demand.IsZero(), "every bar is in a corner")
}

// Bars of an inner layer at the legs are as far from a corner as the leg is long
// between them: from the corner bar to the highest, clear.
func TestHeldBarsAlongALeg(t *testing.T) {
	for _, c := range []struct {
		name string
		top  []group
		want float64
	}{
		{"two layers", []group{{2, "#8"}, {2, "#8"}}, 1},
		{"two sizes", []group{{2, "#8"}, {2, "#6"}}, 1},
		{"three layers", []group{{2, "#8"}, {2, "#8"}, {2, "#8"}}, 3},
		{"bars between, further apart", []group{{3, "#8"}, {2, "#8"}}, (30-5.25)/2 - 1},
	} {
		t.Run(c.name, func(t *testing.T) {
			tr := pressedTrial(t, ACI31819(), "#3", c.top...)
			addZone(tr, 2, 8, 6, 258)
			got := only(t, us19.judgeTies(nil, tr), "ties.held-bars")
			require.InEpsilon(t, c.want, valueIn(t, got.Demand, "in"), 1e-9)
		})
	}
}

// The widest distance of the outer layer counts, wherever it stands in the row,
// and none between bars of two layers.
func TestWidestClearOfALayer(t *testing.T) {
	for _, c := range []struct {
		middle, want float64
	}{{10, 27.375 - 10 - 1}, {20, 20 - 2.625 - 1}} {
		tr := pressedTrial(t, ACI31819(), "#3", group{3, "#8"}, group{2, "#8"})
		tr.Top.Fit.Bars[1].X = units.Inch.Of(c.middle)
		require.InEpsilon(t, c.want, widestClear(&tr.Top, 1).In(units.Inch), 1e-9)
	}
	tr := pressedTrial(t, ACI31819(), "#3", group{5, "#8"}, group{2, "#8"})
	require.InEpsilon(t, (30-5.25)/4-1, widestClear(&tr.Top, 1).In(units.Inch), 1e-9, "not from the last of one layer to the first of the next")
}
