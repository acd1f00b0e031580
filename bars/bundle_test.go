package bars_test

import (
	"fmt"
	"math"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/bars"
	"soffit.example/units"
)

// bundle is a bundle of an embedded size that the test takes for granted.
func bundle(t testing.TB, catalog, name string) bars.Size {
	t.Helper()
	c, err := bars.Lookup(catalog)
	require.NoError(t, err)
	s, err := c.Bundle(name)
	require.NoError(t, err)
	return s
}

// Diameter and area of the single bar that a bundle counts as: ACI 318-19
// 25.6.1.6, worked by hand from the areas of ASTM A615 Table 1. That 2, 3 and
// 4 #8 count as 1.41, 1.73 and 2 in is the root of the number itself.
func TestBundleCountsAs(t *testing.T) {
	for _, row := range []struct {
		catalog, name string
		diameter      float64 // in or mm
		area, mass    string
	}{
		{"astm-inch", "2x#8", math.Sqrt2, "1.58 in2", "5.340 lb/ft"},
		{"astm-inch", "3x#8", math.Sqrt(3), "2.37 in2", "8.010 lb/ft"},
		{"astm-inch", "4x#8", 2, "3.16 in2", "10.680 lb/ft"},
		{"astm-inch", "2x#9", 1.128 * math.Sqrt2, "2.00 in2", "6.800 lb/ft"},
		{"astm-inch", "4x#11", 2.82, "6.24 in2", "21.252 lb/ft"},
		{"astm-metric", "3xNo. 25", 25.4 * math.Sqrt(3), "1530 mm2", "11.919 kg/m"},
		{"csa-g30-18", "4x25M", 50.4, "2000 mm2", "15.700 kg/m"},
	} {
		t.Run(row.catalog+" "+row.name, func(t *testing.T) {
			s := bundle(t, row.catalog, row.name)
			require.Equal(t, row.name, s.Name)
			unit := units.Millimetre
			if row.catalog == "astm-inch" {
				unit = units.Inch
			}
			require.InEpsilon(t, row.diameter, s.Diameter.In(unit), 1e-12)
			require.Equal(t, row.area, s.PrintedArea().String())
			require.Equal(t, row.mass, s.PrintedMass().String())
			require.Empty(t, s.PrintedDiameter())
			require.Empty(t, s.PrintedOverall())
			require.Zero(t, s.Overall)
			area, err := units.ParseArea(row.area)
			require.NoError(t, err)
			require.InEpsilon(t, area.In(units.SquareMetre), s.Area.In(units.SquareMetre), 1e-15)
			mass, err := units.ParseMassPerLength(row.mass)
			require.NoError(t, err)
			require.InEpsilon(t, mass.In(units.KilogramPerMetre), s.MassPerLength.In(units.KilogramPerMetre), 1e-14)
		})
	}
}

// Areas of bundles add up as exactly as those of their bars.
func TestBundleAreasAddExactly(t *testing.T) {
	for _, c := range bars.Catalogs() {
		for _, s := range c.Sizes() {
			for n := 2; n <= bars.MaxBundle; n++ {
				b, err := bars.Bundle(s, n)
				require.NoError(t, err)
				require.Equal(t, bars.TotalArea(bars.Group{Size: s, Count: 5 * n}), bars.TotalArea(bars.Group{Size: b, Count: 5}))
				require.Equal(t, b.Area, bars.TotalArea(bars.Group{Size: b, Count: 1}))
				require.Equal(t, bars.Group{Size: s, Count: 5 * n}.PrintedArea().Text, bars.Group{Size: b, Count: 5}.PrintedArea().Text)
			}
		}
	}
}

// A bundle knows its bar, and its name leads back to it.
func TestBundleOfItsBars(t *testing.T) {
	for _, c := range bars.Catalogs() {
		for _, s := range c.Sizes() {
			one, err := bars.Bundle(s, 1)
			require.NoError(t, err)
			require.Equal(t, s, one)
			require.Equal(t, 1, s.Bundled())
			require.Equal(t, s, s.Single())
			for n := 2; n <= bars.MaxBundle; n++ {
				b, err := bars.Bundle(s, n)
				require.NoError(t, err)
				require.NoError(t, b.Check())
				require.Equal(t, n, b.Bundled())
				require.True(t, b.Single() == s, "exactly the bar")
				require.Equal(t, s.Catalog, b.Catalog)
				require.Equal(t, s.Number, b.Number)
				require.Equal(t, s.Order, b.Order)
				named, err := c.Bundle(fmt.Sprintf("%dx%s", n, s))
				require.NoError(t, err)
				require.True(t, named == b, "the same value")

				bend, err := b.Bend(bars.Main)
				alone, errAlone := s.Bend(bars.Main)
				require.Equal(t, alone, bend)
				require.Equal(t, errAlone == nil, err == nil)
				_, err = b.Bend(bars.Stirrup)
				require.EqualError(t, err, "bars: no bend rule for "+b.Name+" as a stirrup (catalog "+c.ID()+")")
			}
			single, err := c.Bundle(s.Name)
			require.NoError(t, err)
			require.Equal(t, s, single)
		}
		for _, g := range c.Grades() {
			first, _ := g.Range()
			b, err := bars.Bundle(first, 2)
			require.NoError(t, err)
			require.True(t, g.Offers(b))
		}
	}

	hand := bars.Size{Name: "own", Diameter: millimetres(18), Area: units.SquareMillimetre.Of(254), MassPerLength: units.KilogramPerMetre.Of(2)}
	for n := 2; n <= bars.MaxBundle; n++ {
		b, err := bars.Bundle(hand, n)
		require.NoError(t, err)
		require.Equal(t, fmt.Sprintf("%dxown", n), b.Name)
		require.InEpsilon(t, 254*float64(n), b.Area.In(units.SquareMillimetre), 1e-14)
		require.InEpsilon(t, 2*float64(n), b.MassPerLength.In(units.KilogramPerMetre), 1e-14)
		s := b.Single()
		require.Equal(t, "own", s.Name)
		require.Equal(t, 1, s.Bundled())
		require.InEpsilon(t, 18, s.Diameter.In(units.Millimetre), 1e-14)
		require.InEpsilon(t, 254, s.Area.In(units.SquareMillimetre), 1e-14)
		require.InEpsilon(t, 2, s.MassPerLength.In(units.KilogramPerMetre), 1e-14)
		half, towards, away := b.Extent()
		_, wantTowards, wantAway := bundleExtent(18, n)
		require.InEpsilon(t, 18, half.In(units.Millimetre), 1e-14)
		require.InEpsilon(t, wantTowards, towards.In(units.Millimetre), 1e-14)
		require.InEpsilon(t, wantAway, away.In(units.Millimetre), 1e-14)
	}
}

func TestBundleRefuses(t *testing.T) {
	nine := size(t, "astm-inch", "#9")
	pair := bundle(t, "astm-inch", "2x#9")
	for _, row := range []struct {
		name string
		size bars.Size
		n    int
		want bars.RangeError
	}{
		{"none", nine, 0, bars.RangeError{Field: "bundle", Value: "0 bars", Allowed: "1 to 4 bars"}},
		{"negative", nine, -2, bars.RangeError{Field: "bundle", Value: "-2 bars", Allowed: "1 to 4 bars"}},
		{"five", nine, 5, bars.RangeError{Field: "bundle", Value: "5 bars", Allowed: "1 to 4 bars"}},
		{"of a bundle", pair, 2, bars.RangeError{Field: "bundle", Value: "of 2x#9", Allowed: "bars that are not bundled already"}},
		{"no bar", bars.Size{}, 2, bars.RangeError{Field: "size.diameter", Value: "0 m", Allowed: "more than 0 m, at most 1 m"}},
		{"a bar that is none", bars.Size{}, 1, bars.RangeError{Field: "size.diameter", Value: "0 m", Allowed: "more than 0 m, at most 1 m"}},
		{"too thick together", bars.Size{Diameter: units.Metre.Of(0.75), Area: units.SquareMetre.Of(0.1)}, 2,
			bars.RangeError{Field: "size.diameter", Value: units.Metre.Of(0.75 * math.Sqrt2).String(), Allowed: "more than 0 m, at most 1 m"}},
	} {
		t.Run(row.name, func(t *testing.T) {
			s, err := bars.Bundle(row.size, row.n)
			var got *bars.RangeError
			require.ErrorAs(t, err, &got)
			require.Equal(t, row.want, *got)
			if row.n != 1 {
				require.Zero(t, s)
			}
		})
	}

	c, err := bars.Lookup("astm-inch")
	require.NoError(t, err)
	for name, want := range map[string]string{
		"5x#9":  "bars: bundle is 5 bars, allowed: 1 to 4 bars",
		"9x#9":  "bars: bundle is 9 bars, allowed: 1 to 4 bars",
		"2x#12": `bars: no size "#12" in catalog astm-inch; nearest known "#11"`,
		"1x#9":  `bars: no size "1x#9" in catalog astm-inch`,
		"2x":    `bars: no size "2x" in catalog astm-inch`,
		"2X#9":  `bars: no size "2X#9" in catalog astm-inch`,
		"":      `bars: no size "" in catalog astm-inch`,
		":x#9":  `bars: no size ":x#9" in catalog astm-inch`,
	} {
		s, err := c.Bundle(name)
		require.ErrorContains(t, err, want, name)
		require.Zero(t, s)
	}

	cage := inchCage(t, 16, "#4")
	cage.Stirrup, cage.BendRadius = bundle(t, "astm-inch", "2x#4"), inches(1)
	_, err = cage.Fit([]bars.Layer{{{Size: nine, Count: 2}}}, inchRule())
	var got *bars.RangeError
	require.ErrorAs(t, err, &got)
	require.Equal(t, bars.RangeError{Field: "stirrup", Value: "2x#4", Allowed: "a single bar"}, *got)
}

// A size whose own name looks like a bundle is found before the bundle.
func TestBundleNameIsTaken(t *testing.T) {
	c, err := bars.ParseCatalog([]byte(`{"id": "own", "title": "t", "sources": ["s"], "provenance": "p",
		"units": {"diameter": "mm", "area": "mm2", "mass": "kg/m", "yield": "MPa"},
		"sizes": [{"name": "2x10", "number": 8, "diameter": "8", "area": "50.3", "mass": "0.395", "overall": ""},
			{"name": "10", "number": 10, "diameter": "10", "area": "78.5", "mass": "0.617", "overall": ""}],
		"grades": [], "bends": []}`))
	require.NoError(t, err)
	s, err := c.Bundle("2x10")
	require.NoError(t, err)
	require.Equal(t, 1, s.Bundled())
	require.InEpsilon(t, 8, s.Diameter.In(units.Millimetre), 1e-12)
	s, err = c.Bundle("2x2x10")
	require.NoError(t, err)
	require.Equal(t, 2, s.Bundled())
	require.Equal(t, "2x10", s.Single().Name)
}

// bundleExtent is the room of a bundle by elementary geometry: half its
// width, and from its centroid down and up.
func bundleExtent(d float64, n int) (half, towards, away float64) {
	switch n {
	case 1:
		return d / 2, d / 2, d / 2
	case 2:
		return d, d / 2, d / 2
	case 3: // the triangle of the centres has a height of sqrt3/2 d and its centroid at a third
		return d, d/2 + d*math.Sqrt(3)/6, d/2 + d*math.Sqrt(3)/3
	}
	return d, d, d
}

// Expected coordinates are worked by hand: in a #4 stirrup the bend has an
// inside radius of 1 in, and the outer bar of a seated bundle stands at 3 in.
func TestBundleCoordinates(t *testing.T) {
	tri := 1 / math.Sqrt(3)
	for _, row := range []struct {
		name      string
		width     float64
		corner    bars.Corner
		layers    []bars.Layer
		units     []position
		singles   []position
		clear     float64
		required  float64
		cover     float64
		height    float64
		below     float64 // clear, if there are two layers
		symmetric bool
		least     float64
	}{
		{name: "two pairs", width: 16,
			layers:  []bars.Layer{{{Size: bundle(t, "astm-inch", "2x#8"), Count: 2}}},
			units:   []position{{"2x#8", 3.5, 2.5}, {"2x#8", 12.5, 2.5}},
			singles: []position{{"#8", 3, 2.5}, {"#8", 4, 2.5}, {"#8", 12, 2.5}, {"#8", 13, 2.5}},
			clear:   7, required: math.Sqrt2, cover: 2, height: 3, symmetric: true, least: 6 + 3 + math.Sqrt2},
		{name: "three in a triangle", width: 16,
			layers: []bars.Layer{{{Size: bundle(t, "astm-inch", "3x#8"), Count: 2}}},
			units:  []position{{"3x#8", 3.5, 2.5 + tri/2}, {"3x#8", 12.5, 2.5 + tri/2}},
			singles: []position{{"#8", 3, 2.5}, {"#8", 4, 2.5}, {"#8", 3.5, 2.5 + math.Sqrt(3)/2},
				{"#8", 12, 2.5}, {"#8", 13, 2.5}, {"#8", 12.5, 2.5 + math.Sqrt(3)/2}},
			clear: 7, required: math.Sqrt(3), cover: 2, height: 3 + math.Sqrt(3)/2, symmetric: true, least: 6 + 3 + math.Sqrt(3)},
		{name: "four in a square, below a pair", width: 16,
			layers: []bars.Layer{{{Size: bundle(t, "astm-inch", "4x#8"), Count: 2}}, {{Size: bundle(t, "astm-inch", "2x#8"), Count: 2}}},
			units:  []position{{"4x#8", 3.5, 3}, {"4x#8", 12.5, 3}, {"2x#8", 3.5, 5.5}, {"2x#8", 12.5, 5.5}},
			singles: []position{{"#8", 3, 2.5}, {"#8", 4, 2.5}, {"#8", 3, 3.5}, {"#8", 4, 3.5},
				{"#8", 12, 2.5}, {"#8", 13, 2.5}, {"#8", 12, 3.5}, {"#8", 13, 3.5},
				{"#8", 3, 5.5}, {"#8", 4, 5.5}, {"#8", 12, 5.5}, {"#8", 13, 5.5}},
			clear: 7, required: math.Sqrt2, cover: 2, height: 6, below: 1, symmetric: true, least: 6 + 3 + 2},
		{name: "pairs outside, a bar in the middle", width: 16,
			layers:  []bars.Layer{{{Size: size(t, "astm-inch", "#8"), Count: 1}, {Size: bundle(t, "astm-inch", "2x#8"), Count: 2}}},
			units:   []position{{"2x#8", 3.5, 2.5}, {"#8", 8, 2.5}, {"2x#8", 12.5, 2.5}},
			singles: []position{{"#8", 3, 2.5}, {"#8", 4, 2.5}, {"#8", 8, 2.5}, {"#8", 12, 2.5}, {"#8", 13, 2.5}},
			clear:   3, required: math.Sqrt2, cover: 2, height: 3, symmetric: true, least: 6 + 4 + 2*math.Sqrt2},
		{name: "one bundle is centred", width: 9,
			layers:  []bars.Layer{{{Size: bundle(t, "astm-inch", "2x#6"), Count: 1}}},
			units:   []position{{"2x#6", 4.5, 2.375}},
			singles: []position{{"#6", 4.125, 2.375}, {"#6", 4.875, 2.375}},
			cover:   2, height: 2.75, symmetric: true, least: 6 + 0.75},
		{name: "tucked: the outer bar lies in the bend", width: 16, corner: bars.Tucked,
			layers: []bars.Layer{{{Size: bundle(t, "astm-inch", "4x#8"), Count: 2}}},
			units:  []position{{"4x#8", 3.5 - math.Sqrt2/4, 3.5 - math.Sqrt2/4}, {"4x#8", 12.5 + math.Sqrt2/4, 3.5 - math.Sqrt2/4}},
			singles: []position{{"#8", 3 - math.Sqrt2/4, 3 - math.Sqrt2/4}, {"#8", 4 - math.Sqrt2/4, 3 - math.Sqrt2/4},
				{"#8", 3 - math.Sqrt2/4, 4 - math.Sqrt2/4}, {"#8", 4 - math.Sqrt2/4, 4 - math.Sqrt2/4},
				{"#8", 12 + math.Sqrt2/4, 3 - math.Sqrt2/4}, {"#8", 13 + math.Sqrt2/4, 3 - math.Sqrt2/4},
				{"#8", 12 + math.Sqrt2/4, 4 - math.Sqrt2/4}, {"#8", 13 + math.Sqrt2/4, 4 - math.Sqrt2/4}},
			clear: 7 + math.Sqrt2/2, required: 2, cover: 2.5 - math.Sqrt2/4, height: 4.5 - math.Sqrt2/4, symmetric: true,
			least: 6 - math.Sqrt2/2 + 3 + 2},
		{name: "bars wider than the bend", width: 16,
			layers:  []bars.Layer{{{Size: bundle(t, "astm-inch", "2x#18"), Count: 1}, {Size: size(t, "astm-inch", "#8"), Count: 1}}},
			units:   []position{{"2x#18", 2 + 2.257, 2 + 1.1285}, {"#8", 13, 2.5}},
			singles: []position{{"#18", 2 + 1.1285, 2 + 1.1285}, {"#18", 2 + 3*1.1285, 2 + 1.1285}, {"#8", 13, 2.5}},
			clear:   math.Hypot(11-3*1.1285, 0.6285) - 1.6285, required: 2.257 * math.Sqrt2, cover: 2, height: 4.257,
			least: 2 + 3*1.1285 + math.Sqrt(math.Pow(1.6285+2.257*math.Sqrt2, 2)-0.6285*0.6285) + 3},
	} {
		t.Run(row.name, func(t *testing.T) {
			cage := inchCage(t, row.width, "#4")
			cage.Corner = row.corner
			fit, err := cage.Fit(row.layers, inchRule())
			require.NoError(t, err)
			require.True(t, fit.Fits())
			requirePositions(t, row.units, fit)
			all := bars.Fit{Bars: fit.AppendSingles(nil)}
			requirePositions(t, row.singles, &all)
			for i := range all.Bars {
				require.Equal(t, 1, all.Bars[i].Size.Bundled())
			}
			last := fit.Layers[len(fit.Layers)-1]
			if row.clear > 0 {
				require.InEpsilon(t, row.clear, last.LeastClear.In(units.Inch), 1e-12)
				require.InEpsilon(t, row.clear, last.Beside.Clear.In(units.Inch), 1e-12)
				require.InEpsilon(t, row.required, last.Beside.Required.In(units.Inch), 1e-12)
			}
			if row.below > 0 {
				require.InEpsilon(t, row.below, last.Below.Clear.In(units.Inch), 1e-12)
				require.InEpsilon(t, 1, last.Below.Required.In(units.Inch), 1e-12)
				require.True(t, last.Aligned)
			}
			require.InEpsilon(t, row.cover, fit.Layers[0].Cover.In(units.Inch), 1e-12)
			require.InEpsilon(t, row.height, fit.Height.In(units.Inch), 1e-12)
			require.Equal(t, row.symmetric, last.Symmetric)
			require.InEpsilon(t, row.least, fit.LeastWidth.In(units.Inch), 1e-12)

			var area, moment float64
			for _, b := range all.Bars {
				area += b.Size.Area.In(units.SquareInch)
				moment += b.Size.Area.In(units.SquareInch) * b.Y.In(units.Inch)
			}
			require.InEpsilon(t, area, fit.Area.In(units.SquareInch), 1e-12)
			require.InEpsilon(t, moment/area, fit.Centroid.In(units.Inch), 1e-12)
		})
	}
}

// A layer with bars of one size and their pairs is not uniform, though a pair
// may count with the diameter of another bar.
func TestBundleBesideItsEqual(t *testing.T) {
	pair := bundle(t, "astm-inch", "2x#8")
	equal := bars.Size{Name: "equal", Diameter: pair.Diameter, Area: pair.Area}
	cage := inchCage(t, 16, "#4")
	fit, err := cage.Fit([]bars.Layer{{{Size: pair, Count: 1}, {Size: equal, Count: 1}}}, inchRule())
	require.NoError(t, err)
	require.False(t, fit.Layers[0].Symmetric)
	require.Equal(t, "2x#8", fit.Bars[0].Size.Name)
	// The centre of the thick bar is higher than those of the pair.
	require.InEpsilon(t, math.Hypot(13-4, (math.Sqrt2-1)/2)-(1+math.Sqrt2)/2, fit.Layers[0].LeastClear.In(units.Inch), 1e-12)
}

// The highest bars of a bundle meet the bends of the opposite leg.
func TestBundleUnderTheOppositeLeg(t *testing.T) {
	cage := inchCage(t, 16, "#4")
	cage.Corner = bars.Tucked
	layer := []bars.Layer{{{Size: bundle(t, "astm-inch", "4x#8"), Count: 2}}}
	rise := 1 - math.Sqrt2/4 // of a tucked bar over the leg's inner face
	for _, row := range []struct {
		depth  float64 // between the inner faces of the legs
		inside bool
	}{
		{2*rise + 1 + 1e-6, true}, // the upper bar is tucked into the upper bend
		{2*rise + 1 - 1e-6, false},
		{rise + 1.5 + 1e-6, false}, // below the leg, but through its bend
	} {
		cage.Depth = inches(row.depth + 4)
		fit, err := cage.Fit(layer, inchRule())
		require.NoError(t, err)
		require.Equal(t, row.inside, fit.Inside(), "%v in", row.depth)
	}

	// In an upper layer the outer bars keep out of the bends, seated or not.
	cage = inchCage(t, 16, "#4")
	two := []bars.Layer{{{Size: size(t, "astm-inch", "#11"), Count: 2}}, {{Size: bundle(t, "astm-inch", "4x#4"), Count: 2}}}
	cage.Depth = inches(4 + 1.41 + 1 + 1)
	fit, err := cage.Fit(two, inchRule())
	require.NoError(t, err)
	require.True(t, fit.Inside())
	require.InEpsilon(t, 3.25, fit.Bars[2].X.In(units.Inch), 1e-12, "moved inwards until its outer bar stands at the tangent point")
	require.InEpsilon(t, 12.75, fit.Bars[3].X.In(units.Inch), 1e-12)
	require.False(t, fit.Layers[1].Aligned)
}

// Counts by formula and by laying agree for bundles, both corners.
func TestMostBundlesByLaying(t *testing.T) {
	for _, c := range bars.Catalogs() {
		for order := 1; order < c.Len(); order += 2 {
			for n := 2; n <= bars.MaxBundle; n++ {
				b, err := bars.Bundle(c.At(order), n)
				require.NoError(t, err)
				for _, corner := range []bars.Corner{bars.Seated, bars.Tucked} {
					for _, width := range []float64{80, 150, 300, 457.2, 1000} {
						cage := bars.Cage{Width: millimetres(width), SideCover: millimetres(38), FaceCover: millimetres(38), Stirrup: c.At(0), Corner: corner}
						most, err := cage.MostInLayer(b, inchRule().InLayer)
						require.NoError(t, err)
						for count := 1; count <= most+1; count++ {
							fit, err := cage.Fit([]bars.Layer{{{Size: b, Count: count}}}, inchRule())
							require.NoError(t, err)
							require.Equal(t, count <= most, fit.Fits(), fmt.Sprint(c.ID(), " ", count, " ", b, " ", corner, " ", width))
							least, err := cage.LeastWidth(b, count, inchRule().InLayer)
							require.NoError(t, err)
							require.InEpsilon(t, fit.LeastWidth.In(units.Metre), least.In(units.Metre), 1e-12)
						}
					}
				}
			}
		}
	}
}

// The bars of a bundle touch one another, each at least two, and none
// overlaps; their centroid is the bundle's place and they fill its extent.
func TestBundledBarsTouch(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		c := rapid.SampledFrom(bars.Catalogs()).Draw(t, "catalog")
		s := c.At(rapid.IntRange(0, c.Len()-1).Draw(t, "size"))
		n := rapid.IntRange(1, bars.MaxBundle).Draw(t, "bars")
		b, err := bars.Bundle(s, n)
		require.NoError(t, err)
		p := bars.Placed{Size: b, X: millimetres(rapid.Float64Range(-500, 500).Draw(t, "x")), Y: millimetres(rapid.Float64Range(0, 500).Draw(t, "y")), Layer: 3}
		singles := p.AppendSingles(nil)
		require.Len(t, singles, n)
		d := s.Diameter.In(units.Metre)
		var sumX, sumY float64
		low, high, left, right := math.Inf(1), math.Inf(-1), math.Inf(1), math.Inf(-1)
		for i := range singles {
			require.Equal(t, s, singles[i].Size)
			require.Equal(t, 3, singles[i].Layer)
			x, y, r := circle(singles[i])
			sumX, sumY = sumX+x/float64(n), sumY+y/float64(n)
			low, high, left, right = min(low, y-r), max(high, y+r), min(left, x-r), max(right, x+r)
			touching := 0
			for j := range singles {
				if i == j {
					continue
				}
				clear := singles[i].Clear(&singles[j]).In(units.Metre)
				require.GreaterOrEqual(t, clear, -1e-12)
				if clear < 1e-12 {
					touching++
				}
			}
			require.GreaterOrEqual(t, touching, min(n-1, 2))
		}
		x, y := p.X.In(units.Metre), p.Y.In(units.Metre)
		require.InDelta(t, x, sumX, 1e-12)
		require.InDelta(t, y, sumY, 1e-12)
		half, towards, away := b.Extent()
		wantHalf, wantTowards, wantAway := bundleExtent(d, n)
		for _, pair := range [][2]float64{
			{wantHalf, half.In(units.Metre)}, {wantTowards, towards.In(units.Metre)}, {wantAway, away.In(units.Metre)},
			{x - wantHalf, left}, {x + wantHalf, right}, {y - wantTowards, low}, {y + wantAway, high},
		} {
			require.InDelta(t, pair[0], pair[1], 1e-12)
		}
	})
}

// A wider form never takes fewer bundles, nor does more clearance take more.
func TestWiderTakesNoFewer(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		p := drawProblem(t)
		s := p.layers[0][0].Size
		most, err := p.cage.MostInLayer(s, p.need.InLayer)
		require.NoError(t, err)
		wider := p.cage
		wider.Width = wider.Width.Add(millimetres(rapid.Float64Range(0, 500).Draw(t, "wider")))
		more, err := wider.MostInLayer(s, p.need.InLayer)
		require.NoError(t, err)
		require.GreaterOrEqual(t, more, most)
		need := p.need.InLayer
		need.Least = need.Least.Add(millimetres(rapid.Float64Range(0, 50).Draw(t, "clearer")))
		fewer, err := p.cage.MostInLayer(s, need)
		require.NoError(t, err)
		require.LessOrEqual(t, fewer, most)
		if s.Bundled() > 1 {
			single, err := p.cage.MostInLayer(s.Single(), p.need.InLayer)
			require.NoError(t, err)
			require.GreaterOrEqual(t, single, most, "as many bars as bundles fit anyhow")
		}
	})
}

func TestClearOfPlaced(t *testing.T) {
	pair := bars.Placed{Size: bundle(t, "astm-inch", "2x#8"), X: inches(3), Y: inches(2)}
	bar := bars.Placed{Size: size(t, "astm-inch", "#8"), X: inches(6), Y: inches(2)}
	require.InEpsilon(t, 1.5, pair.Clear(&bar).In(units.Inch), 1e-12)
	require.InEpsilon(t, 1.5, bar.Clear(&pair).In(units.Inch), 1e-12)
	bar.X = inches(4)
	require.InEpsilon(t, -0.5, bar.Clear(&pair).In(units.Inch), 1e-12)
	bar.X, bar.Y = inches(3.5), inches(4)
	require.InEpsilon(t, 1, bar.Clear(&pair).In(units.Inch), 1e-12)
}

func TestLayingBundlesAllocatesNothing(t *testing.T) {
	cage := inchCage(t, 20, "#4")
	layers := []bars.Layer{{{Size: size(t, "astm-inch", "#8"), Count: 2}, {Size: bundle(t, "astm-inch", "4x#9"), Count: 2}}, {{Size: bundle(t, "astm-inch", "3x#8"), Count: 2}}}
	need := inchRule()
	var fit bars.Fit
	require.NoError(t, fit.Lay(&cage, layers, need))
	singles := fit.AppendSingles(nil)
	require.Len(t, singles, 2+8+6)
	require.Zero(t, testing.AllocsPerRun(100, func() {
		_ = fit.Lay(&cage, layers, need)
		singles = fit.AppendSingles(singles[:0])
		_, _ = cage.MostInLayer(layers[1][0].Size, need.InLayer)
		_ = fit.Bars[0].Clear(&fit.Bars[1])
	}))
}
