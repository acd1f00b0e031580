package main

import (
	"os"
	"path/filepath"
	"testing"

	"github.com/stretchr/testify/require"
)

// The files of package units are those that the table makes.
func TestFresh(t *testing.T) {
	require.NoError(t, run("../..", true))
}

func TestGenerateIsDeterministic(t *testing.T) {
	first, err := generate(catalog)
	require.NoError(t, err)
	second, err := generate(catalog)
	require.NoError(t, err)
	require.Equal(t, first, second)
}

func TestCheckFindsStaleFiles(t *testing.T) {
	dir := t.TempDir()
	require.NoError(t, run(dir, false))
	require.NoError(t, run(dir, true))

	length := filepath.Join(dir, "length_gen.go")
	require.NoError(t, os.WriteFile(length, []byte("package units\n"), 0o666))
	require.NoError(t, os.WriteFile(filepath.Join(dir, "old_gen.go"), []byte("package units\n"), 0o666))
	require.NoError(t, os.Remove(filepath.Join(dir, "area_gen.go")))
	err := run(dir, true)
	require.ErrorContains(t, err, "length_gen.go is stale")
	require.ErrorContains(t, err, "old_gen.go is no longer generated")
	require.ErrorContains(t, err, "area_gen.go: no such file")

	got, err := os.ReadFile(length)
	require.NoError(t, err)
	require.Equal(t, "package units\n", string(got), "a check writes nothing")
}

// A table that is wrong in itself makes no files.
func TestValidateRefuses(t *testing.T) {
	for _, tt := range []struct {
		name   string
		change func(*table)
		want   string
	}{
		{"quantity twice", func(t *table) { t.Quantities = append(t.Quantities, t.Quantities[0]) }, "Length: the name is taken"},
		{"one field name for two types", func(t *table) { t.Quantities[1].Field = "m" }, "Area: the field m is taken"},
		{"no SI unit first", func(t *table) { t.Quantities[0].Units[0].Num = "1e-3" }, "Length: the first unit must be the SI unit"},
		{"no units", func(t *table) { t.Quantities[0].Units = nil }, "Length: the first unit must be the SI unit"},
		{"unit name twice", func(t *table) { t.Quantities[1].Units[0].Name = "Metre" }, "Area: the unit name Metre is taken"},
		{"symbol twice", func(t *table) { t.Quantities[0].Units[1].Symbol = "m" }, "Length: the symbol m is taken"},
		{"alias of a symbol", func(t *table) { t.Quantities[0].Units[1].Aliases = []string{"m"} }, "Length: the symbol m is taken"},
		{"printed unit missing", func(t *table) { t.Quantities[0].US = "yd" }, "Length: yd is to be printed but is not among its units"},
		{"unknown quantity", func(t *table) { t.Products[0].B = "Width" }, "Length x Width = Area: unknown quantity"},
		{"wrong dimensions", func(t *table) { t.Products[0].C = "Length" }, "Length x Length = Length: the dimensions do not agree"},
		{"wrong plain product", func(t *table) { t.Products[0].C = "" }, "Length x Length = : the dimensions do not agree"},
		{"product twice", func(t *table) { t.Products = append(t.Products, t.Products[0]) }, "Length.MulLength is made twice"},
		{"quotient twice", func(t *table) { t.Products = append(t.Products, product{A: "Slope", B: "Length", C: "Area"}) }, "Area.DivLength is made twice"},
		{"unknown inverse", func(t *table) { t.Inverses = []inverse{{"Length", "Width"}} }, "1/Length = Width: unknown quantity"},
		{"wrong inverse", func(t *table) { t.Inverses = []inverse{{"Length", "Area"}} }, "1/Length = Area: the dimensions do not agree"},
		{"factor that is no expression", func(t *table) { t.Quantities[0].Units[1].Num = "cubit" }, "Millimetre: "},
		{"factor without a decimal form", func(t *table) { t.Quantities[0].Units[1].Num = "1.0 / 3" }, "Millimetre: "},
		{"base that is no expression", func(t *table) { t.Bases = []base{{"inch", "cubit", ""}} }, "inch: "},
	} {
		t.Run(tt.name, func(t *testing.T) {
			changed := small()
			_, err := generate(changed)
			require.NoError(t, err)
			tt.change(&changed)
			_, err = generate(changed)
			require.ErrorContains(t, err, tt.want)
		})
	}
}

// small is a table of three quantities.
func small() table {
	return table{
		Quantities: []quantity{
			{Name: "Length", Field: "m", Dim: [3]int{0, 1, 0}, SI: "mm", US: "mm", Units: []unit{
				{Name: "Metre", Symbol: "m", Num: "1"}, {Name: "Millimetre", Symbol: "mm", Num: "1e-3"}}},
			{Name: "Area", Field: "m2", Dim: [3]int{0, 2, 0}, SI: "m2", US: "m2", Units: []unit{
				{Name: "SquareMetre", Symbol: "m2", Num: "1"}}},
			{Name: "Slope", Field: "m2PerM", Dim: [3]int{0, 1, 0}, SI: "m2/m", US: "m2/m", Units: []unit{
				{Name: "SquareMetrePerMetre", Symbol: "m2/m", Num: "1"}}},
		},
		Products: []product{{A: "Length", B: "Length", C: "Area"}},
	}
}
