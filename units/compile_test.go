package units_test

import (
	"fmt"
	"go/ast"
	"go/importer"
	"go/parser"
	"go/token"
	"go/types"
	"strings"
	"sync"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/units"
)

// source imports packages from their source, once for all tests.
var source = sync.OnceValue(func() types.Importer {
	return importer.ForCompiler(token.NewFileSet(), "source", nil)
})

// typeCheck type-checks each statement, in a function of its own of a package
// that imports units, and returns the errors by statement.
func typeCheck(t *testing.T, statements []string) [][]string {
	t.Helper()
	var src strings.Builder
	src.WriteString("package p; import \"soffit.example/units\"; var (\n_ = units.SI\n")
	for _, name := range quantityNames() {
		fmt.Fprintf(&src, "%s units.%s\n", variable(name), name)
	}
	src.WriteString(")\n")
	first := strings.Count(src.String(), "\n") + 1
	for _, s := range statements {
		fmt.Fprintf(&src, "func _() { %s }\n", s)
	}
	fset := token.NewFileSet()
	file, err := parser.ParseFile(fset, "p.go", src.String(), 0)
	require.NoError(t, err)

	found := make([][]string, len(statements))
	conf := types.Config{
		Importer: source(),
		Error: func(err error) {
			e, ok := err.(types.Error)
			require.True(t, ok, "%v", err)
			i := fset.Position(e.Pos).Line - first
			require.True(t, 0 <= i && i < len(found), "outside the statements: %v", err)
			found[i] = append(found[i], e.Msg)
		},
	}
	_, _ = conf.Check("p", fset, []*ast.File{file}, nil) // Error has seen what it returns
	return found
}

// quantityNames returns the names of the quantity types.
func quantityNames() []string {
	var names []string
	for d := units.DimLength; d.Units() != nil; d++ {
		names = append(names, typeNames[d])
	}
	return names
}

func variable(name string) string { return strings.ToLower(name[:1]) + name[1:] }

func TestMustNotCompile(t *testing.T) {
	tests := []struct{ name, statement, reason string }{
		{"product of lengths by operator", "_ = length * length", "operator * not defined on length"},
		{"sum of lengths by operator", "_ = length + length", "operator + not defined on length"},
		{"length plus force", "_ = length + force", "mismatched types units.Length and units.Force"},
		{"length times a number by operator", "_ = 2 * length", "mismatched types"},
		{"comparison by operator", "_ = length < length", "operator < not defined"},
		{"bare number as a length", "_ = units.Length(5)", "cannot convert 5"},
		{"bare number assigned", "length = 5", "cannot use 5"},
		{"bare number added", "_ = length.Add(5)", "cannot use 5"},
		{"float64 as a length", "x := 5.0; length = x", "cannot use x"},
		{"length as a float64", "_ = float64(length)", "cannot convert length"},
		{"literal from outside", "_ = units.Length{5}", "implicit assignment to unexported field"},
		{"keyed literal from outside", "_ = units.Length{m: 5}", "unexported field m"},
		{"field from outside", "_ = length.m", "m undefined"},
		{"force for a length", "func(units.Length) {}(force)", "cannot use force"},
		{"force converted to a length", "_ = units.Length(force)", "cannot convert force"},
		{"area load converted to a stress", "_ = units.Stress(areaLoad)", "cannot convert areaLoad"},
		{"volume converted to a section modulus", "_ = units.SectionModulus(volume)", "cannot convert volume"},
		{"unit weight converted to a density", "_ = units.Density(unitWeight)", "cannot convert unitWeight"},
		{"force added to a moment", "_ = moment.Add(force)", "cannot use force"},
		{"moment compared with a force", "_ = moment.AtMost(force)", "cannot use force"},
		{"ratio of unlike quantities", "_ = stress.Ratio(areaLoad)", "cannot use areaLoad"},
		{"wrong result of a product", "force = stress.MulLength(length)", "stress.MulLength undefined"},
		{"stress times area as a moment", "moment = stress.MulArea(area)", "cannot use stress.MulArea(area)"},
		{"product with the wrong operand", "_ = stress.MulArea(length)", "cannot use length"},
		{"quotient the wrong way", "_ = length.DivArea(area)", "length.DivArea undefined"},
		{"length read in a unit of force", "_ = length.In(units.Kip)", "cannot use units.Kip"},
		{"stress read in a unit of area load", "_ = stress.In(units.PoundPerSquareFoot)", "cannot use units.PoundPerSquareFoot"},
		{"force from a unit of length", "force = units.Inch.Of(3)", "cannot use units.Inch.Of(3)"},
		{"mass pound for a force", "force = units.PoundMass.Of(3)", "cannot use units.PoundMass.Of(3)"},
		{"force formatted in a unit of length", "_ = units.Foot.Format(force)", "cannot use force"},
		{"unit of another quantity", "var u units.LengthUnit = units.Kip; _ = u", "cannot use units.Kip"},
		{"amount used as a length", "length = length.Amount()", "cannot use length.Amount()"},
		{"typed getter without its check", "length = length.Amount().Length()", "assignment mismatch"},
		{"mixed types in a series", "_ = units.SeriesOf(units.SI, []units.Length{length, force})", "cannot use force"},
	}
	statements := make([]string, len(tests))
	for i, tt := range tests {
		statements[i] = tt.statement
	}
	found := typeCheck(t, statements)
	for i, tt := range tests {
		t.Run(tt.name, func(t *testing.T) {
			require.Len(t, found[i], 1, tt.statement)
			require.Contains(t, found[i][0], tt.reason)
		})
	}
}

// No quantity may be used as another in any way, whichever the two.
func TestMustNotCompileAnyPair(t *testing.T) {
	var statements []string
	for _, a := range quantityNames() {
		for _, b := range quantityNames() {
			if a == b {
				continue
			}
			x, y := variable(a), variable(b)
			statements = append(statements,
				fmt.Sprintf("%s = %s", x, y),
				fmt.Sprintf("_ = units.%s(%s)", a, y),
				fmt.Sprintf("_ = %s.Add(%s)", x, y),
				fmt.Sprintf("_ = %s == %s", x, y))
		}
	}
	for i, errs := range typeCheck(t, statements) {
		require.Len(t, errs, 1, statements[i])
	}
}

// The harness accepts what is right, so that a rejection means something.
func TestMustCompile(t *testing.T) {
	statements := []string{
		"length = length.Add(units.Inch.Of(5))",
		"area = length.MulLength(length)",
		"force = stress.MulArea(area)",
		"moment = stress.MulArea(area).MulLength(length)",
		"length = moment.DivForce(force)",
		"stress = moment.DivSectionModulus(sectionModulus)",
		"rigidity = stress.MulSecondMoment(secondMoment)",
		"curvature = moment.DivRigidity(rigidity)",
		"areaPerLength = area.PerLength(length)",
		"lineLoad = density.Weight().MulArea(area)",
		"var x float64 = length.Ratio(length); _ = x",
		"_ = length == length",
		"length, _ = length.Amount().Length()",
		"_ = units.SeriesOf(units.SI, []units.Amount{length.Amount(), force.Amount()})",
	}
	for i, errs := range typeCheck(t, statements) {
		require.Empty(t, errs, statements[i])
	}
}
