package units_test

import (
	"maps"
	"math/big"
	"regexp"
	"slices"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/units"
)

// exact reads the text of a factor.
func exact(t *testing.T, text string) *big.Rat {
	t.Helper()
	num, den, quotient := strings.Cut(text, "/")
	n, ok := new(big.Rat).SetString(num)
	require.True(t, ok, text)
	if quotient {
		d, ok := new(big.Rat).SetString(den)
		require.True(t, ok, text)
		n.Quo(n, d)
	}
	return n
}

// Each factor in use is the float64 nearest to the factor as text.
func TestFactorTextIsTheFactor(t *testing.T) {
	for _, row := range units.Table() {
		t.Run(row.Name, func(t *testing.T) {
			want, _ := exact(t, row.Factor).Float64()
			a, err := units.AmountOf(row.Dimension, "1", row.Symbol)
			require.NoError(t, err)
			require.Equal(t, want, a.SI())
		})
	}
}

// Factors printed in NIST Special Publication 811 (2008), appendix B.8, to
// seven digits, or exactly where it sets them in bold. Values from memory.
func TestFactorsAsPublished(t *testing.T) {
	for _, tt := range []struct {
		dimension units.Dimension
		symbol    string
		printed   string
		bold      bool
	}{
		{units.DimLength, "in", "2.54E-02", true},
		{units.DimLength, "ft", "3.048E-01", true},
		{units.DimArea, "in2", "6.4516E-04", true},
		{units.DimArea, "ft2", "9.290304E-02", true},
		{units.DimSecondMoment, "in4", "4.162314E-07", false},
		{units.DimSecondMoment, "ft4", "8.630975E-03", false},
		{units.DimSectionModulus, "in3", "1.638706E-05", false},
		{units.DimVolume, "in3", "1.638706E-05", false},
		{units.DimVolume, "ft3", "2.831685E-02", false},
		{units.DimVolume, "yd3", "7.645549E-01", false},
		{units.DimForce, "lb", "4.448222E+00", false},
		{units.DimForce, "kip", "4.448222E+03", false},
		{units.DimLineLoad, "lb/ft", "1.459390E+01", false},
		{units.DimAreaLoad, "psf", "4.788026E+01", false},
		{units.DimMoment, "lb-in", "1.129848E-01", false},
		{units.DimMoment, "lb-ft", "1.355818E+00", false},
		{units.DimStress, "psi", "6.894757E+03", false},
		{units.DimStress, "ksi", "6.894757E+06", false},
		{units.DimDensity, "lb/ft3", "1.601846E+01", false},
		{units.DimMass, "lb", "4.535924E-01", false},
		{units.DimMass, "ton", "9.071847E+02", false},
		{units.DimMassPerLength, "lb/ft", "1.488164E+00", false},
	} {
		t.Run(tt.dimension.String()+" "+tt.symbol, func(t *testing.T) {
			a, err := units.AmountOf(tt.dimension, "1", tt.symbol)
			require.NoError(t, err)
			want, ok := new(big.Rat).SetString(tt.printed)
			require.True(t, ok)
			printed, _ := want.Float64()
			if tt.bold {
				require.Equal(t, printed, a.SI())
				return
			}
			require.InEpsilon(t, printed, a.SI(), 5e-7)
		})
	}
}

// ucumAtoms are the unit atoms of the Unified Code for Units of Measure in kg,
// m and s, as its specification (version 2.1, tables 1 to 5 and the customary
// units) defines them, from memory. Metric atoms take prefixes.
var ucumAtoms = map[string]struct {
	value  string
	dim    [3]int
	metric bool
}{
	"m": {"1", [3]int{0, 1, 0}, true}, "g": {"0.001", [3]int{1, 0, 0}, true},
	"t": {"1000", [3]int{1, 0, 0}, true}, "L": {"0.001", [3]int{0, 3, 0}, true},
	"N": {"1", [3]int{1, 1, -2}, true}, "Pa": {"1", [3]int{1, -1, -2}, true},
	"10*":    {"10", [3]int{}, false},
	"[in_i]": {"0.0254", [3]int{0, 1, 0}, false}, "[ft_i]": {"0.3048", [3]int{0, 1, 0}, false},
	"[yd_i]": {"0.9144", [3]int{0, 1, 0}, false}, "[lb_av]": {"0.45359237", [3]int{1, 0, 0}, false},
	"[ston_av]": {"907.18474", [3]int{1, 0, 0}, false},
	"[lbf_av]":  {"4.4482216152605", [3]int{1, 1, -2}, false},
	"[psi]":     {"4.4482216152605/0.00064516", [3]int{1, -1, -2}, false},
}

var (
	ucumPrefixes  = map[string]string{"": "1", "m": "0.001", "c": "0.01", "k": "1000", "M": "1000000", "G": "1000000000"}
	ucumComponent = regexp.MustCompile(`^(10\*|\[[a-z_]+\]|[A-Za-z]+)(-?[0-9]+)?$`)
)

// The UCUM code of each unit has the dimension and the value of its factor.
func TestUCUM(t *testing.T) {
	for _, row := range units.Table() {
		t.Run(row.Name, func(t *testing.T) {
			value, dim := big.NewRat(1, 1), [3]int{}
			for i, term := range strings.Split(row.UCUM, "/") {
				require.Less(t, i, 2)
				for _, component := range strings.Split(term, ".") {
					m := ucumComponent.FindStringSubmatch(component)
					require.NotNil(t, m, component)
					power := 1
					if m[2] != "" {
						r, ok := new(big.Rat).SetString(m[2])
						require.True(t, ok)
						power = int(r.Num().Int64())
					}
					if i == 1 {
						power = -power
					}
					atom, atomDim := ucumAtom(t, m[1])
					if power < 0 {
						atom, power = atom.Inv(atom), -power
						atomDim = [3]int{-atomDim[0], -atomDim[1], -atomDim[2]}
					}
					for range power {
						value.Mul(value, atom)
						for k := range dim {
							dim[k] += atomDim[k]
						}
					}
				}
			}
			require.Zero(t, value.Cmp(exact(t, row.Factor)), "%s is %s", row.UCUM, value)
			mass, length, time := row.Dimension.Exponents()
			require.Equal(t, [3]int{mass, length, time}, dim)
		})
	}
}

// ucumAtom returns an atom, with a prefix if it is metric.
func ucumAtom(t *testing.T, code string) (*big.Rat, [3]int) {
	t.Helper()
	for _, prefix := range slices.Sorted(maps.Keys(ucumPrefixes)) {
		rest, ok := strings.CutPrefix(code, prefix)
		atom, known := ucumAtoms[rest]
		if ok && known && (prefix == "" || atom.metric) {
			value := exact(t, atom.value)
			return value.Mul(value, exact(t, ucumPrefixes[prefix])), atom.dim
		}
	}
	require.Fail(t, "no UCUM atom", code)
	return nil, [3]int{}
}

func TestTable(t *testing.T) {
	rows := units.Table()
	seen := map[string]bool{}
	for _, row := range rows {
		for _, symbol := range append([]string{row.Symbol}, row.Aliases...) {
			key := row.Dimension.String() + ": " + symbol
			require.False(t, seen[key], key)
			seen[key] = true
			a, err := units.AmountOf(row.Dimension, "3", symbol)
			require.NoError(t, err)
			canonical, err := units.AmountOf(row.Dimension, "3", row.Symbol)
			require.NoError(t, err)
			require.Equal(t, canonical, a)
			require.NotContains(t, row.UCUM, " ")
		}
	}
	for _, alias := range []string{"density: pcf", "unit weight: pcf", "line load: plf", "line load: klf"} {
		require.True(t, seen[alias], alias)
	}
	rows[0].Symbol = "changed"
	require.Equal(t, "m", units.Table()[0].Symbol, "the caller owns the rows")
}
