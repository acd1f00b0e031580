package units

import (
	"cmp"
	"math"
)

//go:generate go run ./internal/gen

// tolerance is the relative slack of every comparison with a limit. Values
// that come from decimal text through binary arithmetic miss a limit that is
// met exactly by some parts in 1e16; 1e-9 is far above that and far below
// anything that can be built or measured.
const tolerance = 1e-9

// AtMost reports whether a meets the upper limit b: a <= b, or a above b by
// less than 1e-9 of b. A limit of zero has no slack. It is false if either is
// NaN. For a lower limit, swap the arguments.
func AtMost(a, b float64) bool {
	// Strictly less, so that an infinite difference never passes.
	return a <= b || a-b < tolerance*math.Abs(b)
}

// A Dimension says what kind of quantity an [Amount] is. Kinds that have the
// same SI unit, such as stress and area load, are different dimensions.
type Dimension uint8

// String returns the name of d, such as "second moment of area".
func (d Dimension) String() string {
	if int(d) >= len(catalog) {
		return "unknown dimension"
	}
	return catalog[d].name
}

// Units returns the symbols of the units of d, the SI unit first and without
// aliases. Plain numbers have none.
func (d Dimension) Units() []string {
	if int(d) >= len(catalog) {
		return nil
	}
	var out []string
	for _, u := range catalog[d].units {
		out = append(out, u.symbol)
	}
	return out
}

// Examples returns how an amount of d is written: a text in US and one in SI
// units.
func (d Dimension) Examples() [2]string {
	if int(d) >= len(catalog) {
		return [2]string{}
	}
	return catalog[d].examples
}

// Exponents returns the powers of mass, length and time that make up d, such
// as 1, 1, -2 for a force.
func (d Dimension) Exponents() (mass, length, time int) {
	if int(d) >= len(catalog) {
		return 0, 0, 0
	}
	e := catalog[d].exponents
	return int(e[0]), int(e[1]), int(e[2])
}

// dimension is what the catalog holds of one dimension.
type dimension struct {
	name      string
	examples  [2]string
	exponents [3]int8  // of mass, length and time
	preferred [2]uint8 // indices of the units printed in each system
	units     []unit   // by unit constant; the SI unit first
}

type unit struct {
	name, symbol string
	aliases      []string
	factor       float64
	exact, ucum  string
}

// find returns the unit of d that symbol names.
func (d Dimension) find(symbol string) (*unit, bool) {
	if int(d) >= len(catalog) {
		return nil, false
	}
	for i := range catalog[d].units {
		u := &catalog[d].units[i]
		if u.symbol == symbol {
			return u, true
		}
		for _, alias := range u.aliases {
			if alias == symbol {
				return u, true
			}
		}
	}
	return nil, false
}

// symbolOf returns the symbol of the i-th unit of d.
func symbolOf(d Dimension, i int) string {
	if list := catalog[d].units; i < len(list) {
		return list[i].symbol
	}
	return "unknown unit"
}

// A UnitRow describes one unit.
type UnitRow struct {
	Dimension Dimension
	Name      string   // "Inch"
	Symbol    string   // "in"
	Aliases   []string // further symbols that are read, never printed
	// Factor is the size of the unit in the SI unit of its dimension,
	// exactly: a decimal, or a quotient of two decimals such as
	// "4.4482216152605/0.00064516".
	Factor string
	SIUnit string // symbol of that SI unit
	UCUM   string // code of the Unified Code for Units of Measure
}

// Table returns every unit, by dimension and then with the SI unit first. The
// caller owns the result.
func Table() []UnitRow {
	var rows []UnitRow
	for d := range catalog {
		for _, u := range catalog[d].units {
			rows = append(rows, UnitRow{
				Dimension: Dimension(d),
				Name:      u.name,
				Symbol:    u.symbol,
				Aliases:   append([]string(nil), u.aliases...),
				Factor:    u.exact,
				SIUnit:    catalog[d].units[0].symbol,
				UCUM:      u.ucum,
			})
		}
	}
	return rows
}

func compare(a, b float64) int { return cmp.Compare(a, b) }

func isFinite(v float64) bool { return v-v == 0 }
