package bars_test

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/bars"
	"soffit.example/units"
)

// Worked by hand. A 12 by 24 in beam with 1.5 in of cover and #4 stirrups has
// x1 = 8.5 in and y1 = 20.5 in between centre lines, by the definitions of
// Aoh and ph in ACI 318-19 22.7.6.1.
func TestEnclosed(t *testing.T) {
	cage := inchCage(t, 12, "#4")
	cage.Depth = inches(24)
	width, depth := cage.Centreline()
	require.InEpsilon(t, 8.5, width.In(units.Inch), 1e-12)
	require.InEpsilon(t, 20.5, depth.In(units.Inch), 1e-12)
	area, perimeter := cage.Enclosed()
	require.InEpsilon(t, 8.5*20.5, area.In(units.SquareInch), 1e-12)
	require.InEpsilon(t, 58, perimeter.In(units.Inch), 1e-12)

	cage.FaceCover = inches(2)
	width, depth = cage.Centreline()
	require.InEpsilon(t, 8.5, width.In(units.Inch), 1e-12)
	require.InEpsilon(t, 19.5, depth.In(units.Inch), 1e-12)

	cage.Stirrup = bars.Size{}
	width, depth = cage.Centreline()
	outsideWidth, outsideDepth := cage.Outside()
	require.Equal(t, outsideWidth, width)
	require.Equal(t, outsideDepth, depth)

	none := inchCage(t, 12, "#4")
	_, depth = none.Centreline()
	require.Zero(t, depth)
	for _, harm := range []func(*bars.Cage){
		func(c *bars.Cage) {},
		func(c *bars.Cage) { c.Depth = inches(3.4) },
		func(c *bars.Cage) { c.Depth, c.Width = inches(24), inches(3.4) },
		func(c *bars.Cage) { c.Depth, c.Width = inches(2), inches(2) },
		func(c *bars.Cage) { c.Depth = units.Metre.Of(math.NaN()) },
	} {
		c := none
		harm(&c)
		area, perimeter := c.Enclosed()
		require.Zero(t, area)
		require.Zero(t, perimeter)
	}
}

// Worked by hand. Outer legs of #4 stirrups with 1.5 in of cover stand 1.75
// in from the sides; a leg that holds a #8 stands 0.75 in from its centre.
func TestLegs(t *testing.T) {
	for _, row := range []struct {
		name   string
		width  float64
		layer  bars.Layer // none: no row
		legs   int
		want   []float64
		held   bool
		widest float64
	}{
		{"two", 16, nil, 2, []float64{1.75, 14.25}, true, 12.5},
		{"two with bars", 16, bars.Layer{{Size: size(t, "astm-inch", "#8"), Count: 3}}, 2, []float64{1.75, 14.25}, true, 12.5},
		{"even without bars", 16, nil, 4, []float64{1.75, 1.75 + 12.5/3, 1.75 + 25/3.0, 14.25}, false, 12.5 / 3},
		{"too few bars", 16, bars.Layer{{Size: size(t, "astm-inch", "#8"), Count: 3}}, 4, []float64{1.75, 1.75 + 12.5/3, 1.75 + 25/3.0, 14.25}, false, 12.5 / 3},
		{"one bar", 16, bars.Layer{{Size: size(t, "astm-inch", "#8"), Count: 1}}, 3, []float64{1.75, 8, 14.25}, false, 6.25},
		{"third leg round the middle bar", 16, bars.Layer{{Size: size(t, "astm-inch", "#8"), Count: 3}}, 3, []float64{1.75, 7.25, 14.25}, true, 7},
		{"third leg left of the middle of an even row", 16, bars.Layer{{Size: size(t, "astm-inch", "#8"), Count: 4}}, 3, []float64{1.75, 3 + 10/3.0 - 0.75, 14.25}, true, 14.25 - 3 - 10/3.0 + 0.75},
		{"each bar held", 16, bars.Layer{{Size: size(t, "astm-inch", "#8"), Count: 4}}, 4, []float64{1.75, 3 + 10/3.0 - 0.75, 13 - 10/3.0 + 0.75, 14.25}, true, 10/3.0 + 1.5},
		{"five bars, four legs", 16, bars.Layer{{Size: size(t, "astm-inch", "#8"), Count: 5}}, 4, []float64{1.75, 4.75, 11.25, 14.25}, true, 6.5},
		{"five bars, five legs", 16, bars.Layer{{Size: size(t, "astm-inch", "#8"), Count: 5}}, 5, []float64{1.75, 4.75, 7.25, 11.25, 14.25}, true, 4},
		// Of bars at 3, 5, ... 19 in the even places, 7.917 and 14.083 in, are
		// nearest to the legs at 8.25 and 13.75 in, of the bars at 9 and 13 in.
		{"nine bars, four legs", 22, bars.Layer{{Size: size(t, "astm-inch", "#8"), Count: 9}}, 4, []float64{1.75, 8.25, 13.75, 20.25}, true, 6.5},
		// The even places are 6.375, 11 and 15.625 in: the bars at 7 and 15 in, and the middle one.
		{"nine bars, five legs", 22, bars.Layer{{Size: size(t, "astm-inch", "#8"), Count: 9}}, 5, []float64{1.75, 6.25, 10.25, 15.75, 20.25}, true, 5.5},
		{"round a bundle", 20, bars.Layer{{Size: bundle(t, "astm-inch", "2x#8"), Count: 3}}, 3, []float64{1.75, 10 - 1.25, 18.25}, true, 9.5},
		// Each #14 leaves 0.3315 in clear beside it, too little for a leg.
		{"no room between the bars", 2*2.8465 + 3*(1.693+0.3315), bars.Layer{{Size: size(t, "astm-inch", "#14"), Count: 4}}, 3,
			[]float64{1.75, 2.8465 + 1.5*(1.693+0.3315), 2*2.8465 + 3*(1.693+0.3315) - 1.75}, false, 2.8465 + 1.5*(1.693+0.3315) - 1.75},
	} {
		t.Run(row.name, func(t *testing.T) {
			cage := inchCage(t, row.width, "#4")
			var bottom []bars.Placed
			if row.layer != nil {
				fit, err := cage.Fit([]bars.Layer{row.layer}, inchRule())
				require.NoError(t, err)
				bottom = fit.Bars
			}
			before := []units.Length{inches(-1)}
			legs, held, err := cage.AppendLegs(before, row.legs, bottom)
			require.NoError(t, err)
			require.Equal(t, before[0], legs[0], "what was there stays")
			legs = legs[1:]
			require.Len(t, legs, row.legs)
			for i := range legs {
				require.InDelta(t, row.want[i], legs[i].In(units.Inch), 1e-9, "leg %d", i)
			}
			require.Equal(t, row.held, held)
			require.InDelta(t, row.widest, bars.WidestApart(legs).In(units.Inch), 1e-9)
		})
	}
	require.Zero(t, bars.WidestApart(nil))
	require.Zero(t, bars.WidestApart([]units.Length{inches(3)}))
}

// A leg exactly as thick as the gap between two bars fits; the bar with room
// is taken although another would be nearer.
func TestLegsNeedRoom(t *testing.T) {
	eight := size(t, "astm-inch", "#8")
	at := func(x float64) bars.Placed {
		return bars.Placed{Size: eight, X: inches(x), Y: inches(2.5), Layer: 1}
	}
	cage := inchCage(t, 16, "#4")
	for _, row := range []struct {
		name string
		row  []bars.Placed
		want float64
		held bool
	}{
		{"just room", []bars.Placed{at(3), at(6), at(7.5), at(13)}, 6.75, true},
		{"too little room beside the nearest", []bars.Placed{at(3), at(6), at(7.4), at(13)}, 5.25, true},
		{"too little room to the right", []bars.Placed{at(3), at(5), at(9), at(10.4)}, 4.25, true},
		{"no room at all", []bars.Placed{at(3), at(4.4), at(5.8), at(13)}, 8, false},
		{"right of the middle", []bars.Placed{at(3), at(8.5), at(13)}, 9.25, true},
		{"at the middle", []bars.Placed{at(3), at(8), at(13)}, 7.25, true},
		{"nowhere", []bars.Placed{at(3), at(math.NaN()), at(13)}, 8, false},
	} {
		t.Run(row.name, func(t *testing.T) {
			legs, held, err := cage.AppendLegs(nil, 3, row.row)
			require.NoError(t, err)
			require.Equal(t, row.held, held)
			require.InEpsilon(t, row.want, legs[1].In(units.Inch), 1e-12)
		})
	}
}

// A leg takes no bar that its mirror image, or the legs between, need: though
// the middle bar is nearer to its even place, each leg of a pair keeps to the
// bars of its own side.
func TestLegsLeaveBarsForOthers(t *testing.T) {
	eight := size(t, "astm-inch", "#8")
	for _, row := range []struct {
		width   float64
		x, want []float64 // of the bars, and of the inner legs
	}{
		{16, []float64{3, 4.6, 8, 11.4, 13}, []float64{3.85, 12.15}},
		{16, []float64{3, 4.6, 7, 9, 11.4, 13}, []float64{6.25, 9.75}},
		{16, []float64{3, 4.6, 7, 9, 11.4, 13}, []float64{3.85, 6.25, 12.15}},
		{16, []float64{3, 4.6, 6.2, 7.8, 9.4, 11.4, 13}, []float64{3.85, 5.45, 10.15, 12.15}},
		{28, []float64{3, 7.5, 12.5, 15.5, 20.5, 25}, []float64{11.75, 16.25}},
		{34, []float64{3, 8.6, 10.2, 14.7, 19.3, 23.8, 25.4, 31}, []float64{7.85, 13.95, 20.05, 26.15}},
	} {
		cage := inchCage(t, row.width, "#4")
		var bottom []bars.Placed
		for _, x := range row.x {
			bottom = append(bottom, bars.Placed{Size: eight, X: inches(x), Y: inches(2.5), Layer: 1})
		}
		legs, held, err := cage.AppendLegs(nil, len(row.want)+2, bottom)
		require.NoError(t, err)
		require.True(t, held)
		for i, x := range row.want {
			require.InEpsilon(t, x, legs[i+1].In(units.Inch), 1e-12)
		}
	}
}

// One leg of a pair without room lets go of both.
func TestLegsHeldAllOrNone(t *testing.T) {
	eight := size(t, "astm-inch", "#8")
	cage := inchCage(t, 16, "#4")
	for _, x := range [][]float64{{3, 6, 11.6, 13}, {3, 4.4, 10, 13}} {
		var bottom []bars.Placed
		for _, x := range x {
			bottom = append(bottom, bars.Placed{Size: eight, X: inches(x), Y: inches(2.5), Layer: 1})
		}
		legs, held, err := cage.AppendLegs(nil, 4, bottom)
		require.NoError(t, err)
		require.False(t, held)
		require.InEpsilon(t, 1.75+12.5/3, legs[1].In(units.Inch), 1e-12)
		require.InEpsilon(t, 1.75+25/3.0, legs[2].In(units.Inch), 1e-12)
	}
}

func TestLegsRefuse(t *testing.T) {
	for _, row := range []struct {
		name string
		n    int
		harm func(*bars.Cage)
		want bars.RangeError
	}{
		{"one", 1, func(*bars.Cage) {}, bars.RangeError{Field: "legs", Value: "1", Allowed: "2 to 20"}},
		{"many", 21, func(*bars.Cage) {}, bars.RangeError{Field: "legs", Value: "21", Allowed: "2 to 20"}},
		{"no stirrup", 2, func(c *bars.Cage) { c.Stirrup = bars.Size{} }, bars.RangeError{Field: "stirrup", Value: "none", Allowed: "a size"}},
		{"no width", 2, func(c *bars.Cage) { c.Width = units.Length{} }, bars.RangeError{Field: "width", Value: "0 m", Allowed: "more than 0 m, at most 100 m"}},
		{"narrow", 2, func(c *bars.Cage) { c.Width = inches(3.99) },
			bars.RangeError{Field: "width", Value: inches(3.99).String(), Allowed: "at least " + inches(4).String() + " for two legs"}},
	} {
		t.Run(row.name, func(t *testing.T) {
			cage := inchCage(t, 16, "#4")
			row.harm(&cage)
			before := []units.Length{inches(1)}
			legs, held, err := cage.AppendLegs(before, row.n, nil)
			var got *bars.RangeError
			require.ErrorAs(t, err, &got)
			require.Equal(t, row.want, *got)
			require.Equal(t, before, legs)
			require.False(t, held)
		})
	}
	cage := inchCage(t, 4, "#4")
	legs, held, err := cage.AppendLegs(nil, 20, nil)
	require.NoError(t, err, "legs side by side")
	require.Len(t, legs, 20)
	require.False(t, held)
}

// Legs stand inside the covers in order. Where they are held, each inner one
// touches a bar of its own, passes through none, and a symmetric row is held
// symmetrically; where not, they are evenly spaced.
func TestLegsHoldBars(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		p := drawProblem(t)
		if p.cage.Stirrup.IsZero() {
			p.cage.Stirrup = bars.Catalogs()[2].At(1)
		}
		fit := p.fit(t)
		p.cage.Width = fit.LeastWidth.Scale(rapid.Float64Range(1, 3).Draw(t, "times least width"))
		fit = p.fit(t)
		row := fit.Bars[:fit.Layers[0].Count]
		n := rapid.IntRange(2, 20).Draw(t, "legs")
		legs, held, err := p.cage.AppendLegs(nil, n, row)
		require.NoError(t, err)
		require.Len(t, legs, n)
		d, width := p.cage.Stirrup.Diameter.In(units.Metre), p.cage.Width.In(units.Metre)
		centreline, _ := p.cage.Centreline()
		require.InDelta(t, centreline.In(units.Metre), legs[n-1].Sub(legs[0]).In(units.Metre), 1e-9)
		taken := map[int]bool{}
		for k := 1; k < n; k++ {
			require.False(t, legs[k].Less(legs[k-1]))
			if !held {
				require.InDelta(t, centreline.In(units.Metre)/float64(n-1), legs[k].Sub(legs[k-1]).In(units.Metre), 1e-9)
			} else if fit.Layers[0].Symmetric && n%2 == 0 {
				require.InDelta(t, width, legs[k].Add(legs[n-1-k]).In(units.Metre), 1e-8)
			}
		}
		if !held {
			return
		}
		for _, leg := range legs[1 : n-1] {
			x, touches := leg.In(units.Metre), -1
			for i := range row {
				half, _, _ := row[i].Size.Extent()
				clear := math.Abs(x-row[i].X.In(units.Metre)) - half.In(units.Metre) - d/2
				require.GreaterOrEqual(t, clear, -1e-9)
				if clear < 1e-9 && !taken[i] && touches < 0 && i > 0 && i < len(row)-1 {
					touches = i
				}
			}
			require.GreaterOrEqual(t, touches, 0)
			taken[touches] = true
		}
	})
}

func TestLegsAllocateNothing(t *testing.T) {
	cage := inchCage(t, 30, "#4")
	fit, err := cage.Fit([]bars.Layer{{{Size: size(t, "astm-inch", "#8"), Count: 9}}}, inchRule())
	require.NoError(t, err)
	legs := make([]units.Length, 0, 20)
	var held bool
	require.Zero(t, testing.AllocsPerRun(100, func() { legs, held, _ = cage.AppendLegs(legs[:0], 6, fit.Bars) }))
	require.True(t, held)
}
