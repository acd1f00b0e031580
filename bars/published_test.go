package bars_test

import (
	"fmt"
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/bars"
	"soffit.example/units"
)

// C.-K. Wang and C. G. Salmon, Reinforced Concrete Design, Table 3.9.2,
// minimum beam width: from a scan of the table's page, legible entries only;
// the book is named from memory. 1.5 in cover, #3 stirrups, widths rounded up
// to 0.1 in. The corner bar lies at the tangent point of the bend, 0.75 in.
func TestLeastWidthWangSalmon(t *testing.T) {
	for _, row := range []struct {
		size  string
		width map[int]float64 // in, by number of bars
	}{
		{"#4", map[int]float64{4: 9.8, 5: 11.3, 7: 14.3, 8: 15.8}},
		{"#6", map[int]float64{5: 12.3, 6: 14.0, 7: 15.8, 8: 17.5}},
		{"#8", map[int]float64{4: 11.3, 5: 13.3, 6: 15.3, 7: 17.3, 8: 19.3}},
		{"#9", map[int]float64{5: 14.3, 6: 16.6, 7: 18.8, 8: 21.1}},
		{"#11", map[int]float64{4: 13.8, 5: 16.6, 6: 19.4, 7: 22.2, 8: 25.0}},
	} {
		for n, width := range row.width {
			t.Run(fmt.Sprintf("%d %s", n, row.size), func(t *testing.T) {
				cage := inchCage(t, 30, "#3")
				s := size(t, "astm-inch", row.size)
				fit, err := cage.Fit([]bars.Layer{{{Size: s, Count: n}}}, inchRule())
				require.NoError(t, err)
				got := fit.LeastWidth.In(units.Inch)
				require.InDelta(t, width, math.Ceil(10*got-1e-6)/10, 1e-6, "unrounded %v", got)

				closed, err := cage.LeastWidth(s, n, inchRule().InLayer)
				require.NoError(t, err)
				require.InEpsilon(t, got, closed.In(units.Inch), 1e-12)
			})
		}
	}
}

// Portland Cement Association, Simplified Design of Reinforced Concrete
// Buildings of Moderate Size and Height, 3rd edition, 2004, Table 3-3, maximum
// number of bars in one layer, from memory. 1.5 in cover; #3 stirrups with
// bars up to #6, #4 stirrups with larger ones.
func TestMostInLayerPCA(t *testing.T) {
	widths := []float64{12, 14, 16, 18, 20, 22, 24, 26, 28, 30, 36} // in
	for _, row := range []struct {
		stirrup, size string
		most          []int
	}{
		{"#3", "#4", []int{5, 6, 8, 9, 10, 12, 13, 14, 16, 17, 21}},
		{"#3", "#5", []int{5, 6, 7, 8, 10, 11, 12, 13, 15, 16, 19}},
		{"#3", "#6", []int{4, 6, 7, 8, 9, 10, 11, 12, 14, 15, 18}},
		{"#4", "#7", []int{4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 17}},
		{"#4", "#8", []int{4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 16}},
		{"#4", "#9", []int{3, 4, 5, 6, 7, 8, 8, 9, 10, 11, 14}},
		{"#4", "#10", []int{3, 4, 4, 5, 6, 7, 8, 8, 9, 10, 12}},
		{"#4", "#11", []int{3, 3, 4, 5, 5, 6, 7, 8, 8, 9, 11}},
	} {
		for i, width := range widths {
			t.Run(fmt.Sprintf("%s in %v in", row.size, width), func(t *testing.T) {
				cage := inchCage(t, width, row.stirrup)
				s := size(t, "astm-inch", row.size)
				got, err := cage.MostInLayer(s, inchRule().InLayer)
				require.NoError(t, err)
				require.Equal(t, row.most[i], got)

				// By laying the bars: so many fit, and one more does not.
				for extra, fits := range []bool{true, false} {
					fit, err := cage.Fit([]bars.Layer{{{Size: s, Count: row.most[i] + extra}}}, inchRule())
					require.NoError(t, err)
					require.Equal(t, fits, fit.Fits())
				}
			})
		}
	}
}

// ASTM A615/A615M, Table 1, nominal dimensions, from memory; diameters and
// areas agree with Setareh and Darvas, Concrete Structures, Springer 2017,
// Table A1.2.
func TestASTMBars(t *testing.T) {
	for _, row := range []struct {
		name                   string
		diameter, area, weight float64 // in, in2, lb/ft
		weightSlack            float64 // weight of the exact area, as its source rounds on the way
	}{
		{"#3", 0.375, 0.11, 0.376, 0.004},
		{"#4", 0.5, 0.2, 0.668, 0.004},
		{"#5", 0.625, 0.31, 1.043, 0.004},
		{"#6", 0.75, 0.44, 1.502, 0.004},
		{"#7", 0.875, 0.6, 2.044, 0.004},
		{"#8", 1.0, 0.79, 2.67, 0.004},
		{"#9", 1.128, 1.0, 3.4, 0.004},
		{"#10", 1.27, 1.27, 4.303, 0.004},
		{"#11", 1.41, 1.56, 5.313, 0.004},
		{"#14", 1.693, 2.25, 7.65, 0.02},
		{"#18", 2.257, 4.0, 13.6, 0.02},
	} {
		t.Run(row.name, func(t *testing.T) {
			s := size(t, "astm-inch", row.name)
			require.InEpsilon(t, row.diameter, s.Diameter.In(units.Inch), 1e-12)
			require.InEpsilon(t, row.area, s.Area.In(units.SquareInch), 1e-12)
			require.InEpsilon(t, row.weight, s.MassPerLength.In(units.PoundMassPerFoot), 1e-12)

			// Numbers 3 to 8 are round bars of so many eighths; the others
			// replaced square bars. A bar weighs 3.4 lb/ft for each in2.
			exact := math.Pi / 4 * float64(s.Number*s.Number) / 64
			if side, ok := map[string]float64{"#9": 1, "#10": 1.125, "#11": 1.25, "#14": 1.5, "#18": 2}[row.name]; ok {
				exact = side * side
			}
			require.InDelta(t, exact, s.Area.In(units.SquareInch), 0.005)
			require.InDelta(t, math.Sqrt(exact*4/math.Pi), s.Diameter.In(units.Inch), 0.0011)
			require.InDelta(t, exact*3.4, s.MassPerLength.In(units.PoundMassPerFoot), row.weightSlack)
		})
	}
}

// The soft-metric bars are the inch bars: each printed value is the inch
// value converted and rounded.
func TestSoftMetricIsInch(t *testing.T) {
	inch, err := bars.Lookup("astm-inch")
	require.NoError(t, err)
	metric, err := bars.Lookup("astm-metric")
	require.NoError(t, err)
	require.Equal(t, inch.Len(), metric.Len())
	for i, s := range inch.Sizes() {
		m := metric.At(i)
		t.Run(s.Name+" "+m.Name, func(t *testing.T) {
			require.InDelta(t, s.Diameter.In(units.Millimetre), m.Diameter.In(units.Millimetre), 0.0501)
			require.InDelta(t, s.Diameter.In(units.Millimetre), float64(m.Number), 0.55)
			area := 0.501 // mm2
			if m.Number == 16 {
				area = 1.01 // ASTM prints 199 mm2 for 0.31 in2 = 200.0 mm2
			}
			require.InDelta(t, s.Area.In(units.SquareMillimetre), m.Area.In(units.SquareMillimetre), area)
			require.InEpsilon(t, s.MassPerLength.In(units.KilogramPerMetre), m.MassPerLength.In(units.KilogramPerMetre), 1e-3)
			require.InDelta(t, s.Overall.In(units.Millimetre), m.Overall.In(units.Millimetre), 0.0501)
		})
	}
}

// Nominal values of round metric bars follow from the diameter: the area is
// that of a circle and the mass 7850 kg/m3 times it (EN 10080:2005 7.2 and
// CSA G30.18, from memory), rounded to what is printed. Of the CSA bars the
// area is round and the diameter follows.
func TestMetricNominalValues(t *testing.T) {
	for _, id := range []string{"en-10080", "as-nzs-4671", "csa-g30-18"} {
		c, err := bars.Lookup(id)
		require.NoError(t, err)
		for _, s := range c.Sizes() {
			t.Run(id+" "+s.Name, func(t *testing.T) {
				d, a := s.Diameter.In(units.Metre), s.Area.In(units.SquareMetre)
				exact := math.Pi / 4 * d * d
				if id == "csa-g30-18" {
					require.InDelta(t, math.Sqrt(4*a/math.Pi)*1e3, d*1e3, 0.0501)
					exact = a
				} else {
					require.InDelta(t, exact*1e6, a*1e6, lastDigit(exact*1e6))
				}
				mass := exact * 7850
				require.InDelta(t, mass, s.MassPerLength.In(units.KilogramPerMetre), lastDigit(mass))
			})
		}
	}
}

// lastDigit is half a unit of the third significant digit of v.
func lastDigit(v float64) float64 {
	return 0.501 * math.Pow(10, math.Floor(math.Log10(v))-2)
}

// ACI 318-19 Tables 25.3.1 and 25.3.2, from memory: the same multiples of the
// diameter in both unit systems, with their own least extensions.
func TestBendsACI(t *testing.T) {
	type hook struct{ diameters, leastInches, leastMillimetres float64 }
	for _, row := range []struct {
		use    bars.Use
		orders [2]int // of the first and last size
		inside float64
		hooks  map[int]hook
	}{
		{bars.Main, [2]int{0, 5}, 6, map[int]hook{90: {12, 0, 0}, 180: {4, 2.5, 65}}},
		{bars.Main, [2]int{6, 8}, 8, map[int]hook{90: {12, 0, 0}, 180: {4, 2.5, 65}}},
		{bars.Main, [2]int{9, 10}, 10, map[int]hook{90: {12, 0, 0}, 180: {4, 2.5, 65}}},
		{bars.Stirrup, [2]int{0, 2}, 4, map[int]hook{90: {6, 3, 75}, 135: {6, 3, 75}, 180: {4, 2.5, 65}}},
		{bars.Stirrup, [2]int{3, 5}, 6, map[int]hook{90: {12, 0, 0}, 135: {6, 3, 75}, 180: {4, 2.5, 65}}},
	} {
		for _, id := range []string{"astm-inch", "astm-metric"} {
			c, err := bars.Lookup(id)
			require.NoError(t, err)
			for order := row.orders[0]; order <= row.orders[1]; order++ {
				s := c.At(order)
				t.Run(fmt.Sprintf("%s %s %s", id, s, row.use), func(t *testing.T) {
					b, err := s.Bend(row.use)
					require.NoError(t, err)
					require.InEpsilon(t, row.inside, b.Inside.Ratio(s.Diameter), 1e-12)
					for angle, want := range row.hooks {
						h, err := s.Hook(row.use, angle)
						require.NoError(t, err)
						least := inches(want.leastInches)
						if id == "astm-metric" {
							least = millimetres(want.leastMillimetres)
						}
						require.InEpsilon(t, s.Diameter.Scale(want.diameters).Max(least).In(units.Inch), h.Extension.In(units.Inch), 1e-12)
						require.Equal(t, b, h.Bend)
					}
				})
			}
		}
	}
}
