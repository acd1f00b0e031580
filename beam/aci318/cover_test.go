package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// Each row of the table (20.5.1.3.1 of 318-19) is read for its own exposure and
// size, though two of them print the same cover.
func TestCoverRows(t *testing.T) {
	e := us19
	e.cover = coverRules{ground: 4, weatherLarge: 3, weatherSmall: 2, interior: 1}
	small, large := sizeOf(t, "astm-inch", "#5"), sizeOf(t, "astm-inch", "#6")
	for _, c := range []struct {
		exposure     beam.Exposure
		small, large float64
	}{{beam.Interior, 1, 1}, {beam.Weather, 2, 3}, {beam.Ground, 4, 4}} {
		require.InEpsilon(t, c.small, e.leastCover(c.exposure, &small).In(units.Inch), 1e-12, c.exposure)
		require.InEpsilon(t, c.large, e.leastCover(c.exposure, &large).In(units.Inch), 1e-12, c.exposure)
	}
}

// The cover of a bar is the least to its face and to either side of the form; of
// all bars of a face that counts which has least to spare.
func TestCoverToFaceAndSides(t *testing.T) {
	cover := func(edit func(tr *beam.Trial)) (bottom, top beam.Check) {
		tr := shearTrial(t, ACI31819(), nil)
		edit(tr)
		found := checksOf(us19.judgeFitting(nil, tr), "cover.bar")
		require.Len(t, found, 2)
		require.Equal(t, beam.Bottom, found[0].Face)
		require.Equal(t, beam.Top, found[1].Face)
		return found[0], found[1]
	}
	// No. 8 and No. 6 inside No. 3 stirrups with 1.5 in. of cover: 1.875 in.
	low, high := cover(func(*beam.Trial) {})
	require.Equal(t, beam.Pass, low.Outcome)
	require.InEpsilon(t, 1.875, valueIn(t, low.Capacity, "in"), 1e-9)
	require.InEpsilon(t, 1.5, valueIn(t, low.Demand, "in"), 1e-9)
	require.InEpsilon(t, 1.875, valueIn(t, high.Capacity, "in"), 1e-9)

	for _, c := range []struct {
		name string
		bar  int
		x, y float64
		want float64
	}{
		{"face", 2, 7, 1.5, 1.0},
		{"left side", 0, 1.25, 2.375, 0.75},
		{"right side", 4, 14 - 1.25, 2.375, 0.75},
		{"last bar", 4, 11.375, 1.5, 1.0},
	} {
		low, high = cover(func(tr *beam.Trial) {
			b := &tr.Bottom.Fit.Bars[c.bar]
			b.X, b.Y = units.Inch.Of(c.x), units.Inch.Of(c.y)
		})
		require.Equal(t, beam.Fail, low.Outcome, c.name)
		require.InEpsilon(t, c.want, valueIn(t, low.Capacity, "in"), 1e-9, c.name)
		require.Equal(t, beam.Pass, high.Outcome, c.name)
	}
}

func TestCoverOfOneSideBar(t *testing.T) {
	tr := shearTrial(t, ACI31819(), nil)
	tr.Side = beam.SideSteel{Size: sizeOf(t, "astm-inch", "#4"), Each: 1, Spacing: units.Inch.Of(8), TensionFace: beam.Bottom}
	require.Len(t, checksOf(us19.judgeFitting(nil, tr), "cover.bar"), 3)
}

func TestCoverWorking(t *testing.T) {
	tr := shearTrial(t, ACI31819(), nil)
	tr.Record = true
	for _, c := range us19.appendCover(nil, tr) {
		requireSymbols(t, &c, "c,min", "c")
		requireEvaluable(t, &c)
	}
}
