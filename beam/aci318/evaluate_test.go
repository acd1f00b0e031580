package aci318

import (
	"fmt"
	"math"
	"strconv"
	"strings"
	"testing"
	"unicode"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
)

// requireEvaluable computes every step of a check again from its expression
// and the values of earlier steps, in the units that the steps state. It knows
// nothing of how the values were computed.
func requireEvaluable(t testing.TB, c *beam.Check) {
	t.Helper()
	require.NotEmpty(t, c.Steps, "%s has no working", c.ID)
	known := map[string]float64{}
	for _, s := range c.Steps {
		v, err := s.Value.In(s.Unit)
		require.NoError(t, err, "%s: %s", c.ID, s.Symbol)
		if s.Expression != "" {
			got, err := evaluate(s.Expression, known)
			require.NoError(t, err, "%s: %s", c.ID, s.Symbol)
			require.InDelta(t, v, got, 1e-9*math.Max(math.Abs(v), 1e-3), "%s: %s = %s", c.ID, s.Symbol, s.Expression)
		}
		_, twice := known[s.Symbol]
		require.False(t, twice, "%s: %s has two values", c.ID, s.Symbol)
		known[s.Symbol] = v
	}
}

// evaluate computes an expression: + - * / ^ √ min max, brackets, numbers, a
// space for a product, symbols.
func evaluate(expression string, known map[string]float64) (v float64, err error) {
	p := expressionParser{text: []rune(expression), known: known}
	defer func() {
		if r := recover(); r != nil {
			err = fmt.Errorf("%q: %v", expression, r)
		}
	}()
	v = p.sum()
	if p.peek() != 0 {
		return 0, fmt.Errorf("%q: cannot read %q", expression, string(p.text))
	}
	return v, nil
}

type expressionParser struct {
	text  []rune
	known map[string]float64
}

func (p *expressionParser) peek() rune {
	for len(p.text) > 0 && p.text[0] == ' ' {
		p.text = p.text[1:]
	}
	if len(p.text) == 0 {
		return 0
	}
	return p.text[0]
}

func (p *expressionParser) take(r rune) bool {
	if p.peek() != r {
		return false
	}
	p.text = p.text[1:]
	return true
}

func (p *expressionParser) sum() float64 {
	v := p.product()
	for {
		switch {
		case p.take('+'):
			v += p.product()
		case p.take('-'):
			v -= p.product()
		default:
			return v
		}
	}
}

func (p *expressionParser) product() float64 {
	v := p.power()
	for {
		switch r := p.peek(); {
		case p.take('*'):
			v *= p.power()
		case p.take('/'):
			v /= p.power()
		case r == 0 || strings.ContainsRune("+-),^", r):
			return v
		default:
			v *= p.power()
		}
	}
}

func (p *expressionParser) power() float64 {
	if p.take('-') {
		return -p.power()
	}
	v := p.value()
	if p.take('^') {
		return math.Pow(v, p.power())
	}
	return v
}

func (p *expressionParser) value() float64 {
	switch {
	case p.take('√'):
		return math.Sqrt(p.value())
	case p.take('('):
		v := p.sum()
		if !p.take(')') {
			panic("a bracket does not close")
		}
		return v
	}
	word := p.word()
	if word == "min" || word == "max" {
		return p.call(word)
	}
	if v, err := strconv.ParseFloat(word, 64); err == nil {
		return v
	}
	v, ok := p.known[word]
	if !ok {
		panic("no value for " + strconv.Quote(word))
	}
	return v
}

// call reads the arguments of min or max.
func (p *expressionParser) call(name string) float64 {
	if !p.take('(') {
		panic("no bracket after " + name)
	}
	v := p.sum()
	for p.take(',') {
		if name == "min" {
			v = math.Min(v, p.sum())
		} else {
			v = math.Max(v, p.sum())
		}
	}
	if !p.take(')') {
		panic("a bracket does not close")
	}
	return v
}

// word is a number or a symbol. A comma belongs to it unless a space follows;
// a slash belongs to it between a comma and a digit, as in As,4/3.
func (p *expressionParser) word() string {
	p.peek()
	n := 0
	for n < len(p.text) {
		r := p.text[n]
		inside := unicode.IsLetter(r) || unicode.IsDigit(r) || r == '\'' || r == '.' ||
			r == ',' && n+1 < len(p.text) && p.text[n+1] != ' ' ||
			r == '/' && n > 1 && p.text[n-2] == ',' && n+1 < len(p.text) && unicode.IsDigit(p.text[n+1])
		if !inside {
			break
		}
		n++
	}
	word := string(p.text[:n])
	p.text = p.text[n:]
	return word
}

func TestEvaluate(t *testing.T) {
	known := map[string]float64{"f'c": 4000, "b": 14, "As,min": 2, "β1": 0.85}
	for expression, want := range map[string]float64{
		"0.85 f'c b":                47600,
		"4 / 2 b":                   28,
		"2 (b + 1)^2 - √f'c * 0":    450,
		"max(As,min, 1, min(3, b))": 3,
		"-b / 7":                    -2,
		"√(b^2 + 4 2 b)":            math.Sqrt(196 + 112),
		"β1":                        0.85,
	} {
		got, err := evaluate(expression, known)
		require.NoError(t, err)
		require.InDelta(t, want, got, 1e-12, expression)
	}
	for _, bad := range []string{"fy", "(b", "b )", "min b", ""} {
		_, err := evaluate(bad, known)
		require.Error(t, err, bad)
	}
}
