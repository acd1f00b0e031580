package working_test

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/internal/expression"
	"soffit.example/beam/working"
	"soffit.example/units"
)

func plain(symbol string, v float64) beam.Step {
	return beam.Step{Symbol: symbol, Value: units.Plain(v)}
}

func TestSubstitution(t *testing.T) {
	given := []beam.Step{
		plain("As", 3.16), plain("As,a", 1.5), plain("As,4/3", 2.5), plain("fy", 60000), plain("f'c", 4500),
		plain("b", 16), plain("d", 23.5), plain("d1", 22), plain("φ", 0.9), plain("β1", 0.825), plain("x", -2), plain("Mu", 1.0/3),
	}
	for _, tc := range []struct{ expression, want string }{
		{"As fy / (0.85 f'c b)", "3.16 × 60000 / (0.85 × 4500 × 16)"},
		{"As fy (d - As / 2)", "3.16 × 60000 × (23.5 - 3.16 / 2)"},
		{"(3 √f'c / fy) b d", "(3 × √4500 / 60000) × 16 × 23.5"},
		{"max(As,a, As,4/3)", "max(1.5, 2.5)"},
		{"(4 / 3) As", "(4 / 3) × 3.16"},
		{"d - √(d^2 - 2 Mu / (φ 0.85 f'c b))", "23.5 - √(23.5^2 - 2 × 0.333333 / (0.9 × 0.85 × 4500 × 16))"},
		{"min(fy, max(-fy, 29000 x))", "min(60000, max(-60000, 29000 × (-2)))"},
		{"d1 β1", "22 × 0.825"},
		{"2 max(As, b)", "2 × max(3.16, 16)"},
		{"d2 b", "d2 × 16"}, // an unknown symbol stays
		{"0.85", ""},
		{"", ""},
	} {
		c := beam.Check{Steps: append(given[:len(given):len(given)], beam.Step{Symbol: "r", Expression: tc.expression})}
		lines := working.Lines(&c, units.US)
		require.Equal(t, tc.want, lines[len(lines)-1].Substitution, tc.expression)
	}
}

func TestSubstitutionHasTheValueOfItsExpression(t *testing.T) {
	known := map[string]float64{"As": 3.16, "fy": 60000, "f'c": 4500, "b": 16, "d": 23.5, "x": -2}
	var given []beam.Step
	for _, s := range []string{"As", "fy", "f'c", "b", "d", "x"} {
		given = append(given, plain(s, known[s]))
	}
	for _, text := range []string{
		"As fy (d - As fy / (2 0.85 f'c b))", "√f'c b d / x", "min(As, b, d) x^2", "d - -x", "fy / b d", "max(3 √f'c, 200) / fy b d",
	} {
		c := beam.Check{Steps: append(given[:len(given):len(given)], beam.Step{Symbol: "r", Expression: text})}
		lines := working.Lines(&c, units.US)
		want, err := expression.Evaluate(text, known)
		require.NoError(t, err)
		got, err := expression.Evaluate(lines[len(lines)-1].Substitution, nil)
		require.NoError(t, err, lines[len(lines)-1].Substitution)
		require.InEpsilon(t, want, got, 1e-12, text)
	}
}

func TestLinesKeepTheUnitOfTheClause(t *testing.T) {
	c := beam.Check{Steps: []beam.Step{
		{Symbol: "f'c", Meaning: "specified strength", Value: units.KSI.Of(4.5).Amount(), Unit: "psi"},
		{Symbol: "s", Meaning: "spacing", Value: units.Inch.Of(9).Amount()},
		{Symbol: "r", Meaning: "root", Clause: "19.2", Expression: "√f'c", Value: units.PSI.Of(67.0820393249937).Amount(), Unit: "psi", Note: "uncapped"},
	}}
	require.Equal(t, []working.Line{
		{Symbol: "f'c", Meaning: "specified strength", Value: units.Measure{Number: "4500", Unit: "psi"}},
		{Symbol: "s", Meaning: "spacing", Value: units.Measure{Number: "228.6", Unit: "mm"}},
		{Symbol: "r", Meaning: "root", Clause: "19.2", Expression: "√f'c", Substitution: "√4500", Value: units.Measure{Number: "67.082039325", Unit: "psi"}, Note: "uncapped"},
	}, working.Lines(&c, units.SI))
	require.Nil(t, working.Lines(&beam.Check{}, units.SI))
}
