package bars_test

import (
	"bytes"
	"encoding/json"
	"os"
	"strings"
	"testing"

	"github.com/shopspring/decimal"
	"github.com/stretchr/testify/require"

	"soffit.example/bars"
	"soffit.example/units"
)

func TestCatalogsAreComplete(t *testing.T) {
	want := map[string]string{
		"astm-inch":   "#3 #4 #5 #6 #7 #8 #9 #10 #11 #14 #18",
		"astm-metric": "No. 10 No. 13 No. 16 No. 19 No. 22 No. 25 No. 29 No. 32 No. 36 No. 43 No. 57",
		"en-10080":    "6 8 10 12 14 16 20 25 28 32 40",
		"csa-g30-18":  "10M 15M 20M 25M 30M 35M 45M 55M",
		"as-nzs-4671": "N10 N12 N16 N20 N24 N28 N32 N36 N40",
	}
	catalogs := bars.Catalogs()
	require.Len(t, catalogs, len(want))
	for _, c := range catalogs {
		var names []string
		for i, s := range c.Sizes() {
			names = append(names, s.Name)
			require.Equal(t, c.ID(), s.Catalog)
			require.Equal(t, i, s.Order)
			require.Equal(t, s, c.At(i))
			require.NoError(t, s.Check())
			require.Contains(t, s.Name, decimal.NewFromInt(int64(s.Number)).String())
			found, err := c.Size(s.Name)
			require.NoError(t, err)
			require.Equal(t, s, found)
		}
		require.Equal(t, want[c.ID()], strings.Join(names, " "))
		require.NotEmpty(t, c.Title())
		require.NotEmpty(t, c.Sources())
		require.Contains(t, c.Provenance(), "rom memory")
		again, err := bars.Lookup(c.ID())
		require.NoError(t, err)
		require.True(t, c == again)
	}
}

func TestCatalogsAreImmutable(t *testing.T) {
	c, err := bars.Lookup("astm-inch")
	require.NoError(t, err)
	c.Sizes()[0].Name = "changed"
	c.Sources()[0] = "changed"
	c.Grades()[0].Name = "changed"
	bars.Catalogs()[0] = bars.Catalog{}
	again, err := bars.Lookup("astm-inch")
	require.NoError(t, err)
	require.Equal(t, "#3", again.At(0).Name)
	require.NotEqual(t, "changed", again.Sources()[0])
	require.Equal(t, "A615 Grade 40", again.Grades()[0].Name)
}

func TestZeroValues(t *testing.T) {
	var c bars.Catalog
	require.True(t, c.IsZero())
	require.Zero(t, c.ID()+c.Title()+c.Provenance())
	require.Zero(t, c.Len()+len(c.Sizes())+len(c.Grades())+len(c.Sources()))
	_, err := c.Size("#3")
	require.Error(t, err)

	var s bars.Size
	require.True(t, s.IsZero())
	require.Error(t, s.Check())
	require.Zero(t, s.PrintedArea().String()+s.PrintedOverall().String())
	_, err = s.Bend(bars.Stirrup)
	require.Error(t, err)
}

func TestUnknownNamesGiveTheNearest(t *testing.T) {
	c, err := bars.Lookup("astm-inch")
	require.NoError(t, err)
	metric, err := bars.Lookup("en-10080")
	require.NoError(t, err)
	for _, row := range []struct{ asked, nearest string }{
		{"#12", "#11"}, {"#17", "#18"}, {"8", "#8"}, {"No. 9", "#9"}, {"#08", "#8"}, {"#99999999999999999999", "#18"}, {"", "#3"},
	} {
		_, err := c.Size(row.asked)
		var e *bars.UnknownError
		require.ErrorAs(t, err, &e)
		require.Equal(t, row.nearest, e.Nearest, row.asked)
		require.Len(t, e.Known, c.Len())
	}
	_, err = metric.Size("d25")
	require.EqualError(t, err, `bars: no size "d25" in catalog en-10080; nearest known "25" (known: 6, 8, 10, 12, 14, 16, 20, 25, 28, 32, 40)`)
	_, err = bars.Lookup("astm-inches")
	require.EqualError(t, err, `bars: no catalog "astm-inches"; nearest known "astm-inch" (known: astm-inch, astm-metric, en-10080, csa-g30-18, as-nzs-4671)`)
	_, err = c.Grade("A615 Grade 75")
	require.ErrorContains(t, err, `nearest known "A615 Grade`)
}

func TestGrades(t *testing.T) {
	c, err := bars.Lookup("astm-inch")
	require.NoError(t, err)
	g, err := c.Grade("A615 Grade 40")
	require.NoError(t, err)
	require.InEpsilon(t, 40, g.Yield.In(units.KSI), 1e-12)
	require.Equal(t, "40 ksi", g.Printed().String())
	require.True(t, g.Offers(size(t, "astm-inch", "#6")))
	require.False(t, g.Offers(size(t, "astm-inch", "#7")))
	require.False(t, g.Offers(size(t, "astm-metric", "No. 10")))
	first, last := g.Range()
	require.Equal(t, "#3 #6", first.Name+" "+last.Name)
	for _, c := range bars.Catalogs() {
		require.NotEmpty(t, c.Grades())
		for _, g := range c.Grades() {
			require.NotEmpty(t, g.Source)
			require.True(t, g.Yield.In(units.Megapascal) > 200 && g.Yield.In(units.Megapascal) < 800)
		}
	}
}

func TestPrintedValuesKeepTheirText(t *testing.T) {
	s := size(t, "astm-inch", "#9")
	require.Equal(t, "1.128 in", s.PrintedDiameter().String())
	require.Equal(t, "1.00 in2", s.PrintedArea().String())
	require.Equal(t, "3.400 lb/ft", s.PrintedMass().String())
	require.Equal(t, "1.250 in", s.PrintedOverall().String())
	require.Empty(t, size(t, "csa-g30-18", "25M").PrintedOverall())
}

// Of #10 the diameter and the area are the same digits, so that columns
// swapped in a table pass every other look.
func TestNumberTenColumns(t *testing.T) {
	inch, metric := size(t, "astm-inch", "#10"), size(t, "astm-metric", "No. 32")
	require.Equal(t, "1.270 in", inch.PrintedDiameter().String())
	require.Equal(t, "1.27 in2", inch.PrintedArea().String())
	require.Equal(t, "32.3 mm", metric.PrintedDiameter().String())
	require.Equal(t, "819 mm2", metric.PrintedArea().String())
}

func TestTotalAreaIsExact(t *testing.T) {
	ten, nine := size(t, "astm-inch", "#10"), size(t, "astm-inch", "#9")
	require.Equal(t, "5.08 in2", bars.Group{Size: ten, Count: 4}.PrintedArea().String())
	require.Equal(t, "1.20 in2", bars.Group{Size: size(t, "astm-inch", "#7"), Count: 2}.PrintedArea().String())
	require.Equal(t, "5.08 in2", units.US.Format(bars.TotalArea(bars.Group{Size: ten, Count: 4}).Amount()))
	require.Equal(t, "4.54 in2", units.US.Format(bars.TotalArea(bars.Group{Size: nine, Count: 2}, bars.Group{Size: ten, Count: 2}).Amount()))
	require.Zero(t, bars.TotalArea())

	// Every size in every number, and every two neighbours, against decimal.
	for _, c := range bars.Catalogs() {
		unit := units.SquareMillimetre
		if c.ID() == "astm-inch" {
			unit = units.SquareInch
		}
		for i, s := range c.Sizes() {
			for n := 1; n <= 60; n++ {
				groups := []bars.Group{{Size: s, Count: n}, {Size: c.At(max(0, i-1)), Count: 61 - n}}
				want := decimal.Zero
				for _, g := range groups {
					want = want.Add(g.Size.PrintedArea().Value.Mul(decimal.NewFromInt(int64(g.Count))))
				}
				require.Equal(t, want.String()+" "+unit.String(), unit.Format(bars.TotalArea(groups...)))
			}
		}
	}

	byHand := bars.Size{Name: "x", Diameter: millimetres(20), Area: units.SquareMillimetre.Of(310)}
	require.Equal(t, "1000 mm2", units.SI.Format(bars.TotalArea(
		bars.Group{Size: byHand, Count: 3}, bars.Group{Size: size(t, "en-10080", "6"), Count: 1},
		bars.Group{Size: bars.Size{Area: units.SquareMillimetre.Of(41.7)}, Count: 1}).Amount()))
}

func TestMass(t *testing.T) {
	// 20 ft of #8 at 2.670 lb/ft.
	require.InEpsilon(t, 53.4, size(t, "astm-inch", "#8").Mass(units.Foot.Of(20)).In(units.PoundMass), 1e-12)
}

func TestBendRulesThatAreMissing(t *testing.T) {
	for _, row := range []struct {
		catalog, size string
		use           bars.Use
		angle         int // 0 for the bend
		want          string
	}{
		{"astm-inch", "#9", bars.Stirrup, 0, "bars: no bend rule for #9 as a stirrup (catalog astm-inch)"},
		{"astm-inch", "#9", bars.Stirrup, 135, "bars: no bend rule for #9 as a stirrup (catalog astm-inch)"},
		{"astm-inch", "#8", bars.Main, 135, "bars: no rule for a 135-degree hook for #8 as a main bar (catalog astm-inch)"},
		{"astm-inch", "#4", bars.Stirrup, 45, "bars: no rule for a 45-degree hook for #4 as a stirrup (catalog astm-inch)"},
		{"as-nzs-4671", "N12", bars.Stirrup, 135, "bars: no rule for a 135-degree hook for N12 as a stirrup (catalog as-nzs-4671)"},
		{"csa-g30-18", "20M", bars.Stirrup, 0, "bars: no bend rule for 20M as a stirrup (catalog csa-g30-18)"},
		{"en-10080", "10", 0, 0, "bars: no bend rule for 10 as a bar of unknown use (catalog en-10080)"},
		{"en-10080", "10", 200, 0, "bars: no bend rule for 10 as a bar of unknown use (catalog en-10080)"},
	} {
		s := size(t, row.catalog, row.size)
		var err error
		if row.angle == 0 {
			_, err = s.Bend(row.use)
		} else {
			_, err = s.Hook(row.use, row.angle)
		}
		var e *bars.NoRuleError
		require.ErrorAs(t, err, &e)
		require.EqualError(t, err, row.want)
	}
}

// EN 1992-1-1:2004 Table 8.1N and Figure 8.5, and CSA A23.1, from memory.
func TestBendsElsewhere(t *testing.T) {
	for _, row := range []struct {
		catalog, size string
		use           bars.Use
		inside        float64 // mm
		angle         int
		extension     float64 // mm
	}{
		{"en-10080", "16", bars.Main, 64, 90, 80},
		{"en-10080", "20", bars.Main, 140, 180, 100},
		{"en-10080", "8", bars.Stirrup, 32, 135, 50},
		{"en-10080", "12", bars.Stirrup, 48, 135, 60},
		{"en-10080", "6", bars.Stirrup, 24, 90, 70},
		{"csa-g30-18", "10M", bars.Stirrup, 45.2, 135, 67.8},
		{"csa-g30-18", "25M", bars.Main, 150, 90, 302.4},
		{"as-nzs-4671", "N16", bars.Main, 80, 180, 70},
	} {
		h, err := size(t, row.catalog, row.size).Hook(row.use, row.angle)
		require.NoError(t, err)
		require.InEpsilon(t, row.inside, h.Inside.In(units.Millimetre), 1e-12)
		require.InEpsilon(t, row.extension, h.Extension.In(units.Millimetre), 1e-12)
		require.NotEmpty(t, h.Source)
	}
}

// edit changes one value of a valid catalog file.
func edit(t *testing.T, old, new string) []byte {
	t.Helper()
	data, err := os.ReadFile("data/astm-inch.json")
	require.NoError(t, err)
	require.True(t, bytes.Contains(data, []byte(old)), old)
	return bytes.Replace(data, []byte(old), []byte(new), 1)
}

func TestParseCatalogRefuses(t *testing.T) {
	for _, row := range []struct{ name, old, new, want string }{
		{"no id", `"astm-inch"`, `""`, "id needs 1 to 60 bytes"},
		{"unknown field", `"title"`, `"titel"`, `unknown field "titel"`},
		{"trailing data", "\n}\n", "\n} {}", "data after its end"},
		{"no sources", `["ASTM A615/A615M and A706/A706M, Table 1: nominal diameter, area and weight"]`, `[]`, "sources"},
		{"no number", `"0.375"`, `"3/8"`, "is not a number"},
		{"sign", `"0.375"`, `"-0.375"`, "is not a number"},
		{"exponent", `"0.375"`, `"1e-3"`, "is not a number"},
		{"wide digits", `"0.375"`, `"０.375"`, "is not a number"},
		{"too many digits", `"0.375"`, `"0.3750000000000000000"`, "is not a number"},
		{"zero", `"0.375"`, `"0.000"`, "allowed: more than 0"},
		{"wrong diameter", `"0.375"`, `"0.400"`, "area 0.11 in2 is not that of diameter 0.400 in"},
		{"not growing", `"0.375", "area": "0.11", "mass": "0.376", "overall": "0.4375"`, `"0.500", "area": "0.20", "mass": "0.668"`, "does not grow"},
		{"wrong area", `"area": "0.79"`, `"area": "0.97"`, "not that of diameter 1.000 in within 5 %"},
		{"wrong mass", `"mass": "2.670"`, `"mass": "2.067"`, "not that of area 0.79 in2 within 5 %"},
		{"overall too small", `"overall": "1.125"`, `"overall": "0.125"`, "less than the diameter"},
		{"unit of area", `"in2"`, `"in"`, "area"},
		{"unit of mass", `"lb/ft"`, `"lb"`, "mass"},
		{"name taken", `"#4",  "number"`, `"#3",  "number"`, "name is taken"},
		{"no name", `"#4",  "number"`, `"",  "number"`, "name needs"},
		{"grade of no size", `"to": "#6",  "source": "ASTM`, `"to": "#2",  "source": "ASTM`, `no size "#2" at or after "#3"`},
		{"yield", `"yield": "40"`, `"yield": "x"`, "yield"},
		{"use", `"use": "main"`, `"use": "hoop"`, `allowed: "main" or "stirrup"`},
		{"range turned round", `"from": "#9", "to": "#11"`, `"from": "#11", "to": "#9"`, "at or after"},
		{"two rules", `"from": "#9", "to": "#11"`, `"from": "#8", "to": "#11"`, "#8 has two rules as a main bar"},
		{"both insides", `"inside_diameters": "6"`, `"inside_diameters": "6", "inside_diameter": "3"`, "give one of"},
		{"huge bend", `"inside_diameters": "6"`, `"inside_diameters": "600"`, "at most 100 bar diameters"},
		{"angle", `"angle": 135`, `"angle": 120`, "allowed: 90, 135 or 180 degrees"},
		{"no extension", `{"angle": 90, "extension_diameters": "12"}`, `{"angle": 90}`, "extension_diameters"},
		{"extension", `"extension_least": "2.5"`, `"extension_least": "0"`, "extension_least"},
	} {
		t.Run(row.name, func(t *testing.T) {
			_, err := bars.ParseCatalog(edit(t, row.old, row.new))
			require.ErrorContains(t, err, row.want)
			require.ErrorContains(t, err, "bars: ")
		})
	}
	_, err := bars.ParseCatalog(nil)
	require.Error(t, err)
}

func FuzzParseCatalog(f *testing.F) {
	// Short seeds: the fuzzer spends its time on shortening long ones.
	f.Add([]byte(`{"id":"x","sources":["y"],"units":{"diameter":"mm","area":"mm2","mass":"kg/m","yield":"MPa"},
		"sizes":[{"name":"a","number":1,"diameter":"10","area":"78.5","mass":"0.617","overall":"12"}],
		"grades":[{"name":"g","yield":"500","from":"a","to":"a"}],
		"bends":[{"use":"stirrup","from":"a","to":"a","inside_diameters":"4","hooks":[{"angle":90,"extension_diameters":"10","extension_least":"70"}]}]}`))
	f.Add([]byte(`{"id":"x","sources":["y"],"units":{},"sizes":[{}]}`))
	f.Fuzz(func(t *testing.T, data []byte) {
		c, err := bars.ParseCatalog(data)
		if err != nil {
			require.True(t, c.IsZero())
			return
		}
		require.True(t, json.Valid(data))
		for _, s := range c.Sizes() {
			require.NoError(t, s.Check())
			total := bars.TotalArea(bars.Group{Size: s, Count: 3})
			require.InEpsilon(t, 3*s.Area.In(units.SquareMetre), total.In(units.SquareMetre), 1e-12)
			for _, use := range []bars.Use{bars.Main, bars.Stirrup} {
				if b, err := s.Bend(use); err == nil {
					require.Positive(t, b.Inside.In(units.Metre))
				}
			}
		}
	})
}
