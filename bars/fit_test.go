package bars_test

import (
	"fmt"
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/bars"
	"soffit.example/units"
)

// position is where a bar should lie, in inches.
type position struct {
	size string
	x, y float64
}

func requirePositions(t *testing.T, want []position, f *bars.Fit) {
	t.Helper()
	require.Len(t, f.Bars, len(want))
	for i, b := range f.Bars {
		require.Equal(t, want[i].size, b.Size.Name, "bar %d", i)
		require.InDelta(t, want[i].x, b.X.In(units.Inch), 1e-9, "x of bar %d", i)
		require.InDelta(t, want[i].y, b.Y.In(units.Inch), 1e-9, "y of bar %d", i)
	}
}

// Expected coordinates are worked by hand from the geometry: the inside radius
// of a #4 stirrup's bend is 2 bar diameters, 1 in (ACI 318-19 Table 25.3.2).
func TestFitCoordinates(t *testing.T) {
	eight := math.Sqrt2 / 4 // (1 - 0.5)/sqrt2: a tucked #8 in a #4 stirrup
	// A #9 beside a #8 on the same level: 1.128 in clear along the slope.
	beside := math.Sqrt(2.192*2.192 - 0.064*0.064)
	for _, row := range []struct {
		name       string
		width      float64
		stirrup    string
		corner     bars.Corner
		layers     [][]string // name and count, alternating, by layer
		counts     [][]int
		want       []position
		symmetric  []bool
		aligned    []bool
		more       []bool
		fits       bool
		leastWidth float64
	}{
		{name: "seated at the tangent point, upper bars above the corners",
			width: 16, stirrup: "#4", layers: [][]string{{"#9"}, {"#9"}}, counts: [][]int{{4}, {2}},
			want: []position{
				{"#9", 3, 2.564}, {"#9", 3 + 10/3.0, 2.564}, {"#9", 3 + 20/3.0, 2.564}, {"#9", 13, 2.564},
				{"#9", 3, 4.692}, {"#9", 13, 4.692}},
			symmetric: []bool{true, true}, aligned: []bool{false, true}, more: []bool{false, false},
			fits: true, leastWidth: 6 + 3*2.256},
		{name: "tucked on the diagonal, neighbour on the leg",
			width: 12, stirrup: "#4", corner: bars.Tucked, layers: [][]string{{"#8"}}, counts: [][]int{{3}},
			want:      []position{{"#8", 3 - eight, 3 - eight}, {"#8", 6, 2.5}, {"#8", 9 + eight, 3 - eight}},
			symmetric: []bool{true}, aligned: []bool{false}, more: []bool{false},
			// Neighbours are 2 in apart along the slope that rises 0.5 - eight.
			fits: true, leastWidth: 2 * (3 - eight + math.Sqrt(4-(0.5-eight)*(0.5-eight)))},
		{name: "bar wider than the bend",
			width: 12, stirrup: "#3", layers: [][]string{{"#14"}}, counts: [][]int{{2}},
			want:      []position{{"#14", 1.875 + 0.8465, 1.875 + 0.8465}, {"#14", 12 - 1.875 - 0.8465, 1.875 + 0.8465}},
			symmetric: []bool{true}, aligned: []bool{false}, more: []bool{false},
			fits: true, leastWidth: 2*(1.875+0.8465) + 2*1.693},
		{name: "bar wider than the bend cannot be tucked",
			width: 12, stirrup: "#3", corner: bars.Tucked, layers: [][]string{{"#14"}}, counts: [][]int{{2}},
			want:      []position{{"#14", 1.875 + 0.8465, 1.875 + 0.8465}, {"#14", 12 - 1.875 - 0.8465, 1.875 + 0.8465}},
			symmetric: []bool{true}, aligned: []bool{false}, more: []bool{false},
			fits: true, leastWidth: 2*(1.875+0.8465) + 2*1.693},
		{name: "no stirrup: cover to the bars",
			width: 8, layers: [][]string{{"#8"}}, counts: [][]int{{3}},
			want:      []position{{"#8", 2, 2}, {"#8", 4, 2}, {"#8", 6, 2}},
			symmetric: []bool{true}, aligned: []bool{false}, more: []bool{false},
			fits: true, leastWidth: 8},
		{name: "one bar is centred",
			width: 9, stirrup: "#4", corner: bars.Tucked, layers: [][]string{{"#6"}}, counts: [][]int{{1}},
			want:      []position{{"#6", 4.5, 2.375}},
			symmetric: []bool{true}, aligned: []bool{false}, more: []bool{false},
			fits: true, leastWidth: 6},
		{name: "mixed sizes: larger outermost, odd one in the middle",
			width: 20, stirrup: "#4", layers: [][]string{{"#8", "#9"}}, counts: [][]int{{3, 2}},
			// Each gap gets what it needs (beside a #9, whose centre is 0.064 in
			// higher, 1.128 in; between #8 bars 1 in) and a quarter of the rest.
			want: []position{{"#9", 3, 2.564}, {"#8", 10 - 2 - (14-4-2*beside)/4, 2.5}, {"#8", 10, 2.5},
				{"#8", 10 + 2 + (14-4-2*beside)/4, 2.5}, {"#9", 17, 2.564}},
			symmetric: []bool{true}, aligned: []bool{false}, more: []bool{false},
			fits: true, leastWidth: 6 + 2*2 + 2*beside},
		{name: "two odd sizes cannot be symmetric",
			width: 16, stirrup: "#4", layers: [][]string{{"#9", "#8"}}, counts: [][]int{{1, 1}},
			want:      []position{{"#9", 3, 2.564}, {"#8", 13, 2.5}},
			symmetric: []bool{false}, aligned: []bool{false}, more: []bool{false},
			fits: true, leastWidth: 6 + beside},
		{name: "odd bar over an even layer stays aligned",
			width: 16, stirrup: "#4", layers: [][]string{{"#8"}, {"#8"}}, counts: [][]int{{4}, {3}},
			want: []position{
				{"#8", 3, 2.5}, {"#8", 3 + 10/3.0, 2.5}, {"#8", 3 + 20/3.0, 2.5}, {"#8", 13, 2.5},
				{"#8", 3, 4.5}, {"#8", 3 + 10/3.0, 4.5}, {"#8", 13, 4.5}},
			symmetric: []bool{true, false}, aligned: []bool{false, true}, more: []bool{false, false},
			fits: true, leastWidth: 6 + 3*2},
		{name: "odd bar over an odd layer stands in the middle",
			width: 16, stirrup: "#4", layers: [][]string{{"#8"}, {"#8"}}, counts: [][]int{{5}, {3}},
			want: []position{
				{"#8", 3, 2.5}, {"#8", 5.5, 2.5}, {"#8", 8, 2.5}, {"#8", 10.5, 2.5}, {"#8", 13, 2.5},
				{"#8", 3, 4.5}, {"#8", 8, 4.5}, {"#8", 13, 4.5}},
			symmetric: []bool{true, true}, aligned: []bool{false, true}, more: []bool{false, false},
			fits: true, leastWidth: 6 + 4*2},
		{name: "more bars above than below",
			width: 16, stirrup: "#4", layers: [][]string{{"#8"}, {"#8"}}, counts: [][]int{{2}, {3}},
			want: []position{{"#8", 3, 2.5}, {"#8", 13, 2.5},
				{"#8", 3, 4.5}, {"#8", 8, 4.5}, {"#8", 13, 4.5}},
			symmetric: []bool{true, true}, aligned: []bool{false, false}, more: []bool{false, true},
			fits: true, leastWidth: 6 + 2*2},
		{name: "wide bar above a tucked one moves inwards",
			width: 16, stirrup: "#4", corner: bars.Tucked, layers: [][]string{{"#3"}, {"#14"}}, counts: [][]int{{2}, {2}},
			// The #3 lies 1 - (1 - 0.1875)/sqrt2 from the legs; the #14 needs its radius.
			want: []position{{"#3", 3 - 0.8125/math.Sqrt2, 3 - 0.8125/math.Sqrt2}, {"#3", 13 + 0.8125/math.Sqrt2, 3 - 0.8125/math.Sqrt2},
				{"#14", 2.8465, 3 - 0.8125/math.Sqrt2 + 0.1875 + 1 + 0.8465}, {"#14", 13.1535, 3 - 0.8125/math.Sqrt2 + 0.1875 + 1 + 0.8465}},
			symmetric: []bool{true, true}, aligned: []bool{false, false}, more: []bool{false, false},
			fits: true, leastWidth: 2*2.8465 + 2*1.693},
	} {
		t.Run(row.name, func(t *testing.T) {
			cage := bars.Cage{Width: inches(row.width), SideCover: inches(1.5), FaceCover: inches(1.5), Corner: row.corner}
			if row.stirrup != "" {
				cage.Stirrup = size(t, "astm-inch", row.stirrup)
			}
			var layers []bars.Layer
			for i := range row.layers {
				var l bars.Layer
				for j, name := range row.layers[i] {
					l = append(l, bars.Group{Size: size(t, "astm-inch", name), Count: row.counts[i][j]})
				}
				layers = append(layers, l)
			}
			fit, err := cage.Fit(layers, inchRule())
			require.NoError(t, err)
			requirePositions(t, row.want, fit)
			for i, l := range fit.Layers {
				require.Equal(t, row.symmetric[i], l.Symmetric, "symmetric, layer %d", i+1)
				require.Equal(t, row.aligned[i], l.Aligned, "aligned, layer %d", i+1)
				require.Equal(t, row.more[i], l.MoreThanBelow, "more than below, layer %d", i+1)
			}
			require.Equal(t, row.fits, fit.Fits())
			require.InEpsilon(t, row.leastWidth, fit.LeastWidth.In(units.Inch), 1e-12)
		})
	}
}

func TestFitMeasures(t *testing.T) {
	cage := inchCage(t, 16, "#4")
	nine, eight := size(t, "astm-inch", "#9"), size(t, "astm-inch", "#8")
	fit, err := cage.Fit([]bars.Layer{{{Size: nine, Count: 4}}, {{Size: eight, Count: 2}}}, inchRule())
	require.NoError(t, err)

	low, high := 2.564, 3.128+1+0.5
	require.InEpsilon(t, (4*1.00*low+2*0.79*high)/5.58, fit.Centroid.In(units.Inch), 1e-12)
	require.Equal(t, "5.58 in2", units.US.Format(fit.Area.Amount()))
	require.InEpsilon(t, high+0.5, fit.Height.In(units.Inch), 1e-12)
	first, second := fit.Layers[0], fit.Layers[1]
	require.InEpsilon(t, low, first.Centroid.In(units.Inch), 1e-12)
	require.InEpsilon(t, high, second.Centroid.In(units.Inch), 1e-12)
	require.InEpsilon(t, 2, first.Cover.In(units.Inch), 1e-12)
	require.InEpsilon(t, 10/3.0, first.Spacing.In(units.Inch), 1e-12)
	require.InEpsilon(t, 10/3.0-1.128, first.Beside.Clear.In(units.Inch), 1e-12)
	require.InEpsilon(t, 1.128, first.Beside.Required.In(units.Inch), 1e-12)
	require.Equal(t, [2]int{0, 1}, [2]int{first.Beside.A, first.Beside.B})
	require.False(t, first.Below.Exists())
	require.InEpsilon(t, 9, second.LeastClear.In(units.Inch), 1e-12)
	require.InEpsilon(t, 1, second.Below.Clear.In(units.Inch), 1e-12)
	require.Equal(t, [2]int{0, 4}, [2]int{second.Below.A, second.Below.B})
	require.Equal(t, first.Beside, fit.Horizontal())
	require.Equal(t, second.Below, fit.Vertical())
	require.True(t, fit.Aligned())

	require.InEpsilon(t, low, fit.EdgeDistance(1).In(units.Inch), 1e-12)
	require.InEpsilon(t, 3, fit.EdgeDistance(5).In(units.Inch), 1e-12)
	require.InEpsilon(t, 10/3.0, fit.NeighbourDistance(1).In(units.Inch), 1e-12)
	require.InEpsilon(t, 10, fit.NeighbourDistance(5).In(units.Inch), 1e-12)

	width, depth := cage.Outside()
	require.InEpsilon(t, 13, width.In(units.Inch), 1e-12)
	require.Zero(t, depth)
}

// The clear distance beside a tucked corner bar is measured along the slope
// to its neighbour.
func TestTuckedGapIsDiagonal(t *testing.T) {
	cage := inchCage(t, 12, "#4")
	cage.Corner = bars.Tucked
	fit, err := cage.Fit([]bars.Layer{{{Size: size(t, "astm-inch", "#8"), Count: 3}}}, inchRule())
	require.NoError(t, err)
	offset := math.Sqrt2 / 4
	run, rise := 6-(3-offset), 0.5-offset
	require.InEpsilon(t, math.Hypot(run, rise)-1, fit.Layers[0].LeastClear.In(units.Inch), 1e-12)
	require.InEpsilon(t, 2, fit.Layers[0].Cover.In(units.Inch), 1e-12, "the middle bar is nearest the face")
}

func TestDepthAndSideFaults(t *testing.T) {
	eight := size(t, "astm-inch", "#8")
	three := []bars.Layer{{{Size: eight, Count: 2}}, {{Size: eight, Count: 2}}, {{Size: eight, Count: 2}}}
	cage := inchCage(t, 12, "#4")
	cage.Depth = inches(2*2 + 3 + 2) // stirrup legs, three bars, two gaps
	fit, err := cage.Fit(three, inchRule())
	require.NoError(t, err)
	// The highest bars touch the opposite leg at the tangent points of its bends.
	require.True(t, fit.Fits())
	cage.Depth = inches(8.99)
	require.NoError(t, fit.Lay(&cage, three, inchRule()))
	require.False(t, fit.Inside())
	require.False(t, fit.Fits())

	// Too narrow for the stirrup's own bends, though two tucked bars would go in.
	cage = inchCage(t, 5.9, "#4")
	cage.Corner = bars.Tucked
	thin := []bars.Layer{{{Size: size(t, "astm-inch", "#3"), Count: 2}}}
	require.NoError(t, fit.Lay(&cage, thin, bars.Clearances{}))
	require.True(t, fit.Horizontal().OK())
	require.False(t, fit.Fits())
	require.InEpsilon(t, 6, fit.LeastWidth.In(units.Inch), 1e-12)
}

// A form so narrow that the corners change places never looks as if it fits.
func TestVeryNarrowForm(t *testing.T) {
	for _, corner := range []bars.Corner{bars.Seated, bars.Tucked} {
		for width := 0.25; width < 9; width += 0.25 {
			cage := inchCage(t, width, "#4")
			cage.Corner = corner
			fit, err := cage.Fit([]bars.Layer{{{Size: size(t, "astm-inch", "#9"), Count: 3}}}, inchRule())
			require.NoError(t, err)
			require.False(t, fit.Fits(), "%v in", width)
		}
	}
}

// The width that places handbooks print: 2[cover + stirrup + max(R, db/2)] +
// (n - 1)(db + clear).
func TestLeastWidthOfPlainLayer(t *testing.T) {
	for _, c := range bars.Catalogs() {
		for _, stirrup := range c.Sizes() {
			bend, err := stirrup.Bend(bars.Stirrup)
			if err != nil {
				continue
			}
			for _, s := range c.Sizes() {
				for n := 1; n <= 12; n++ {
					cage := bars.Cage{Width: millimetres(500), SideCover: millimetres(37), FaceCover: millimetres(42), Stirrup: stirrup}
					need := bars.Clearances{InLayer: bars.Clearance{Least: millimetres(28), Diameters: 1.4}}
					fit, err := cage.Fit([]bars.Layer{{{Size: s, Count: n}}}, need)
					require.NoError(t, err)
					db, ds := s.Diameter.In(units.Millimetre), stirrup.Diameter.In(units.Millimetre)
					clear := max(28, 1.4*db)
					want := 2*(37+ds+max(bend.Radius().In(units.Millimetre), db/2)) + float64(n-1)*(db+clear)
					require.InEpsilon(t, want, fit.LeastWidth.In(units.Millimetre), 1e-12, "%s %d %s in %s", c.ID(), n, s, stirrup)
				}
			}
		}
	}
}

func TestFitRefuses(t *testing.T) {
	good := func() (bars.Cage, []bars.Layer, bars.Clearances) {
		return inchCage(t, 16, "#4"), []bars.Layer{{{Size: size(t, "astm-inch", "#8"), Count: 3}}}, inchRule()
	}
	nan, inf := math.NaN(), math.Inf(1)
	for _, row := range []struct {
		name string
		harm func(*bars.Cage, *[]bars.Layer, *bars.Clearances)
		want string
	}{
		{"zero width", func(c *bars.Cage, _ *[]bars.Layer, _ *bars.Clearances) { c.Width = units.Length{} }, "width is 0 m, allowed: more than 0 m, at most 100 m"},
		{"negative width", func(c *bars.Cage, _ *[]bars.Layer, _ *bars.Clearances) { c.Width = units.Metre.Of(-1) }, "width is -1 m"},
		{"infinite width", func(c *bars.Cage, _ *[]bars.Layer, _ *bars.Clearances) { c.Width = units.Metre.Of(inf) }, "width is"},
		{"no width", func(c *bars.Cage, _ *[]bars.Layer, _ *bars.Clearances) { c.Width = units.Metre.Of(nan) }, "width is"},
		{"negative depth", func(c *bars.Cage, _ *[]bars.Layer, _ *bars.Clearances) { c.Depth = units.Metre.Of(-1) }, "depth is -1 m"},
		{"negative side cover", func(c *bars.Cage, _ *[]bars.Layer, _ *bars.Clearances) { c.SideCover = units.Metre.Of(-1) }, "side cover is -1 m, allowed: 0 m to 10 m"},
		{"huge face cover", func(c *bars.Cage, _ *[]bars.Layer, _ *bars.Clearances) { c.FaceCover = units.Metre.Of(11) }, "face cover is 11 m"},
		{"negative bend", func(c *bars.Cage, _ *[]bars.Layer, _ *bars.Clearances) { c.BendRadius = units.Metre.Of(-1) }, "bend radius is -1 m"},
		{"bend without stirrup", func(c *bars.Cage, _ *[]bars.Layer, _ *bars.Clearances) {
			c.Stirrup, c.BendRadius = bars.Size{}, units.Metre.Of(1)
		}, "zero without a stirrup"},
		{"stirrup without rule", func(c *bars.Cage, _ *[]bars.Layer, _ *bars.Clearances) { c.Stirrup = size(t, "astm-inch", "#9") }, "no bend rule for #9 as a stirrup"},
		{"stirrup by hand", func(c *bars.Cage, _ *[]bars.Layer, _ *bars.Clearances) {
			c.Stirrup = bars.Size{Name: "x", Diameter: units.Metre.Of(0.01)}
		}, "no bend rule for x as a stirrup (a size made by hand)"},
		{"stirrup without diameter", func(c *bars.Cage, _ *[]bars.Layer, _ *bars.Clearances) { c.Stirrup = bars.Size{Name: "x"} }, "stirrup diameter is 0 m"},
		{"unknown corner", func(c *bars.Cage, _ *[]bars.Layer, _ *bars.Clearances) { c.Corner = 9 }, "corner is unknown corner, allowed: seated or tucked"},
		{"negative clearance", func(_ *bars.Cage, _ *[]bars.Layer, n *bars.Clearances) { n.InLayer.Least = units.Metre.Of(-1) }, "clearance in a layer is -1 m"},
		{"huge clearance", func(_ *bars.Cage, _ *[]bars.Layer, n *bars.Clearances) { n.BetweenLayers.Least = units.Metre.Of(11) }, "clearance between layers is 11 m"},
		{"clearance factor", func(_ *bars.Cage, _ *[]bars.Layer, n *bars.Clearances) { n.InLayer.Diameters = nan }, "clearance in a layer is NaN diameters, allowed: 0 to 100 diameters"},
		{"no layers", func(_ *bars.Cage, l *[]bars.Layer, _ *bars.Clearances) { *l = nil }, "layers is 0, allowed: at least 1"},
		{"empty layer", func(_ *bars.Cage, l *[]bars.Layer, _ *bars.Clearances) { *l = append(*l, nil) }, "layers[1] is empty"},
		{"no bars", func(_ *bars.Cage, l *[]bars.Layer, _ *bars.Clearances) { (*l)[0][0].Count = 0 }, "layers[0][0].count is 0, allowed: at least 1, and 1000 in all"},
		{"negative count", func(_ *bars.Cage, l *[]bars.Layer, _ *bars.Clearances) { (*l)[0][0].Count = -3 }, "layers[0][0].count is -3"},
		{"too many bars", func(_ *bars.Cage, l *[]bars.Layer, _ *bars.Clearances) {
			(*l)[0] = append((*l)[0], bars.Group{Size: (*l)[0][0].Size, Count: 998})
		}, "layers[0][1].count is 998"},
		{"zero size", func(_ *bars.Cage, l *[]bars.Layer, _ *bars.Clearances) { (*l)[0][0].Size = bars.Size{} }, "layers[0][0].size.diameter is 0 m"},
		{"size without area", func(_ *bars.Cage, l *[]bars.Layer, _ *bars.Clearances) {
			(*l)[0][0].Size = bars.Size{Diameter: inches(1)}
		}, "layers[0][0].size.area is 0 m2"},
	} {
		t.Run(row.name, func(t *testing.T) {
			cage, layers, need := good()
			fit, err := cage.Fit(layers, need)
			require.NoError(t, err)
			row.harm(&cage, &layers, &need)
			require.ErrorContains(t, fit.Lay(&cage, layers, need), row.want)
			require.Empty(t, fit.Bars)
			require.False(t, fit.Fits())
		})
	}

	cage, _, need := good()
	_, err := cage.MostInLayer(bars.Size{}, need.InLayer)
	require.ErrorContains(t, err, "size.diameter")
	_, err = cage.LeastWidth(size(t, "astm-inch", "#8"), 0, need.InLayer)
	require.ErrorContains(t, err, "count is 0, allowed: 1 to 1000")
	cage.Width = units.Length{}
	_, err = cage.MostInLayer(size(t, "astm-inch", "#8"), need.InLayer)
	require.ErrorContains(t, err, "width is 0 m")
}

// Counts by formula and by laying agree for both corners, and never exceed
// MaxBars.
func TestMostInLayerByLaying(t *testing.T) {
	for _, c := range bars.Catalogs() {
		stirrup := c.At(0)
		for _, s := range c.Sizes() {
			for _, corner := range []bars.Corner{bars.Seated, bars.Tucked} {
				for _, width := range []float64{80, 150, 300, 457.2, 1000} {
					cage := bars.Cage{Width: millimetres(width), SideCover: millimetres(38), FaceCover: millimetres(38), Stirrup: stirrup, Corner: corner}
					most, err := cage.MostInLayer(s, inchRule().InLayer)
					require.NoError(t, err)
					laid := 0
					for n := 1; ; n++ {
						fit, err := cage.Fit([]bars.Layer{{{Size: s, Count: n}}}, inchRule())
						require.NoError(t, err)
						if !fit.Fits() {
							break
						}
						laid = n
					}
					require.Equal(t, laid, most, fmt.Sprint(c.ID(), s, corner, width))
				}
			}
		}
	}
	cage := bars.Cage{Width: units.Metre.Of(100)}
	most, err := cage.MostInLayer(size(t, "en-10080", "6"), bars.Clearance{})
	require.NoError(t, err)
	require.Equal(t, bars.MaxBars, most)
}

func TestLayAllocatesNothing(t *testing.T) {
	cage := inchCage(t, 16, "#4")
	layers := []bars.Layer{{{Size: size(t, "astm-inch", "#8"), Count: 2}, {Size: size(t, "astm-inch", "#9"), Count: 2}}, {{Size: size(t, "astm-inch", "#8"), Count: 2}}}
	need := inchRule()
	var fit bars.Fit
	require.NoError(t, fit.Lay(&cage, layers, need))
	require.Zero(t, testing.AllocsPerRun(100, func() {
		_ = fit.Lay(&cage, layers, need)
		_, _ = cage.MostInLayer(layers[0][0].Size, need.InLayer)
		_ = bars.TotalArea(layers[0]...)
		_, _ = layers[0][0].Size.Bend(bars.Main)
	}))
}

func BenchmarkLay(b *testing.B) {
	cage := inchCage(b, 16, "#4")
	layers := []bars.Layer{{{Size: size(b, "astm-inch", "#9"), Count: 4}}, {{Size: size(b, "astm-inch", "#9"), Count: 2}}}
	need := inchRule()
	var fit bars.Fit
	b.ReportAllocs()
	for b.Loop() {
		if err := fit.Lay(&cage, layers, need); err != nil {
			b.Fatal(err)
		}
	}
}

func BenchmarkMostInLayer(b *testing.B) {
	cage := inchCage(b, 16, "#4")
	s, need := size(b, "astm-inch", "#9"), inchRule()
	b.ReportAllocs()
	for b.Loop() {
		if _, err := cage.MostInLayer(s, need.InLayer); err != nil {
			b.Fatal(err)
		}
	}
}

func BenchmarkTotalArea(b *testing.B) {
	groups := []bars.Group{{Size: size(b, "astm-inch", "#9"), Count: 4}, {Size: size(b, "astm-inch", "#8"), Count: 2}}
	b.ReportAllocs()
	for b.Loop() {
		_ = bars.TotalArea(groups...)
	}
}
