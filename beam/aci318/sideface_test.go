package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// deepUnder is a trial of 14 by 48 in. under demands, with the bars given.
func deepUnder(t testing.TB, bottom, top []group, demands ...beam.Demand) *beam.Trial {
	t.Helper()
	b := demandBrief(demands...)
	b.Section.Depth = units.Inch.Of(48)
	return trialOf(t, problemOf(t, ACI31819(), b), "#3", bottom, top)
}

// The faces that 9.7.2.3 asks about are those that a demand puts in tension,
// however small it is; where none does, nothing can be judged.
func TestSideFacesOfDemands(t *testing.T) {
	sagging, hogging := beam.Demand{Name: "1", Moment: units.NewtonMetre.Of(0.5)}, beam.Demand{Name: "2", Moment: units.NewtonMetre.Of(-0.5)}
	none := beam.Demand{Name: "3", Shear: units.Kip.Of(10)}
	for _, c := range []struct {
		demands []beam.Demand
		faces   []beam.Face
	}{
		{[]beam.Demand{sagging, none}, []beam.Face{beam.Bottom}},
		{[]beam.Demand{none, hogging}, []beam.Face{beam.Top}},
		{[]beam.Demand{hogging, sagging}, []beam.Face{beam.Bottom, beam.Top}},
	} {
		var faces []beam.Face
		for _, got := range checksOf(us19.judgeWhole(nil, deepUnder(t, []group{{3, "#8"}}, []group{{3, "#8"}}, c.demands...)), "side-face.spacing") {
			require.NotEqual(t, beam.NotJudged, got.Outcome)
			faces = append(faces, got.Face)
		}
		require.Equal(t, c.faces, faces)
	}
	got := only(t, us19.judgeWhole(nil, deepUnder(t, []group{{3, "#8"}}, []group{{3, "#8"}}, none)), "side-face.spacing")
	require.Equal(t, beam.NotJudged, got.Outcome)
	require.Contains(t, got.Reason, "no moment says")
	got = only(t, us19.judgeWhole(nil, deepUnder(t, nil, []group{{3, "#8"}}, sagging)), "side-face.spacing")
	require.Equal(t, beam.NotJudged, got.Outcome, "the face in tension has no bars to count from")
	got = only(t, us19.judgeWhole(nil, deepUnder(t, []group{{1, "#8"}}, []group{{3, "#8"}}, sagging)), "side-face.spacing")
	require.Equal(t, beam.Fail, got.Outcome, "one bar is a face in tension too")
}

// A check that fails for want of side bars says so; one with too few of them, or
// one that passes, does not.
func TestSideFaceInWords(t *testing.T) {
	demand := beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)}
	for _, c := range []struct {
		each    int
		spacing float64
		outcome beam.Outcome
		says    string
	}{
		{0, 0, beam.Fail, "there are no bars along the side faces"},
		{1, 8, beam.Fail, ""},
		{2, 12, beam.Fail, ""},
		{2, 10, beam.Pass, ""},
	} {
		tr := deepUnder(t, []group{{3, "#8"}}, []group{{3, "#8"}}, demand)
		tr.Record = true
		tr.Side = beam.SideSteel{Size: sizeOf(t, "astm-inch", "#4"), Each: c.each, Spacing: units.Inch.Of(c.spacing), TensionFace: beam.Bottom}
		got := only(t, us19.judgeWhole(nil, tr), "side-face.spacing")
		require.Equal(t, c.outcome, got.Outcome)
		require.Equal(t, c.says, got.Reason)
		requireSymbols(t, &got, "fy", "cc", "fs", "s,max", "s")
		requireEvaluable(t, &got)
	}
	// Layers that leave no more than 10.3 in. up to mid-depth need no side bars,
	// and nothing is missing.
	tr := deepUnder(t, []group{{3, "#8"}}, []group{{3, "#8"}}, demand)
	tr.Bottom.Farthest = units.Inch.Of(15)
	got := only(t, us19.judgeWhole(nil, tr), "side-face.spacing")
	require.Equal(t, beam.Pass, got.Outcome)
	require.Empty(t, got.Reason)
}

// Layers of the face are bars along the side too, from centroid to centroid; a
// single bar in the middle of the web is not.
func TestLayersAlongTheSide(t *testing.T) {
	inch := units.Inch.Of
	for _, c := range []struct {
		name     string
		counts   []int
		heights  []float64
		farthest float64
		want     float64
	}{
		{"one layer", []int{3}, []float64{2.5}, 2.5, 24 - 2.5},
		{"two layers", []int{3, 2}, []float64{2.5, 14}, 14, 14 - 2.5},
		{"two layers close", []int{3, 2}, []float64{2.5, 12}, 12, 24 - 12},
		{"three layers, the lower two apart", []int{3, 2, 2}, []float64{2.5, 13, 20}, 20, 13 - 2.5},
		{"three layers, the upper two apart", []int{3, 2, 2}, []float64{2.5, 6, 19}, 19, 19 - 6},
		{"a single bar between", []int{3, 1, 2}, []float64{2.5, 8, 16}, 16, 16 - 2.5},
		{"a single bar above", []int{3, 2, 1}, []float64{2.5, 12.5, 20}, 12.5, 24 - 12.5},
		{"up to mid-depth", []int{3, 2}, []float64{2.5, 24}, 24, 24 - 2.5},
	} {
		t.Run(c.name, func(t *testing.T) {
			tr := deepUnder(t, []group{{3, "#8"}}, []group{{3, "#8"}}, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
			layer := tr.Bottom.Fit.Layers[0]
			tr.Bottom.Fit.Layers = nil
			for i, n := range c.counts {
				layer.Count, layer.Centroid = n, inch(c.heights[i])
				tr.Bottom.Fit.Layers = append(tr.Bottom.Fit.Layers, layer)
			}
			tr.Bottom.Farthest = inch(c.farthest)
			require.InEpsilon(t, c.want, sideGap(tr, beam.Bottom).In(units.Inch), 1e-9)
		})
	}
	// Bars that reach mid-depth are followed no further.
	tr := deepUnder(t, []group{{3, "#8"}}, []group{{3, "#8"}}, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	tr.Bottom.Farthest = inch(24)
	tr.Side = beam.SideSteel{Size: sizeOf(t, "astm-inch", "#4"), Each: 1, Spacing: inch(15), TensionFace: beam.Bottom}
	require.True(t, sideGap(tr, beam.Bottom).IsZero())
}
