// Package working shows how a check came to its values: each step of the
// working as a line with its expression, and the same expression with the
// values of earlier steps put in.
//
// Lines are a view of a result. The substitution is made from the expression
// and the steps alone, so that it cannot say anything else than they do.
// Values are in the units that each clause is written in, at 12 significant
// digits; in substitutions they have six.
//
// Expressions use + - * / ^ √ min max, brackets, numbers, a space for a
// product, and symbols of earlier steps. Products and quotients are taken from
// left to right. A comma between arguments is followed by a space, one within
// a symbol is not.
package working

import (
	"math"
	"slices"
	"strconv"
	"strings"
	"unicode"
	"unicode/utf8"

	"soffit.example/beam"
	"soffit.example/units"
)

// Line is one step of the working as a reader sees it.
type Line struct {
	Symbol       string
	Meaning      string
	Clause       string // empty: none
	Expression   string // empty: an input
	Substitution string // empty: an input, or an expression without symbols
	Value        units.Measure
	Note         string
}

// Lines shows the working of a check; nil if it has none. The system is for
// values whose clause does not say a unit.
func Lines(c *beam.Check, system units.System) []Line {
	if len(c.Steps) == 0 {
		return nil
	}
	lines := make([]Line, len(c.Steps))
	known := make(symbols, 0, len(c.Steps))
	for i := range c.Steps {
		s := &c.Steps[i]
		value := system.ExpressIn(s.Value, s.Unit)
		lines[i] = Line{
			Symbol: s.Symbol, Meaning: s.Meaning, Clause: s.Clause, Expression: s.Expression,
			Substitution: known.substitute(s.Expression), Value: value, Note: s.Note,
		}
		known = known.with(s.Symbol, value)
	}
	return lines
}

// symbols are the symbols known so far with their values as printed, the
// longest first.
type symbols []symbol

type symbol struct{ name, value string }

func (k symbols) with(name string, value units.Measure) symbols {
	v, err := value.Number.Float64()
	if err != nil || name == "" {
		return k
	}
	printed := short(v)
	if v < 0 {
		printed = "(" + printed + ")"
	}
	k = slices.DeleteFunc(k, func(s symbol) bool { return s.name == name })
	at, _ := slices.BinarySearchFunc(k, name, func(s symbol, name string) int { return len(name) - len(s.name) })
	return slices.Insert(k, at, symbol{name, printed})
}

// short prints six significant digits.
func short(v float64) string {
	s := strconv.FormatFloat(v, 'g', 6, 64)
	rounded, err := strconv.ParseFloat(s, 64)
	if err != nil || rounded == 0 {
		return "0"
	}
	if m := math.Abs(rounded); m < 1e-6 || m >= 1e15 {
		return s
	}
	return strconv.FormatFloat(rounded, 'f', -1, 64)
}

// match finds the known symbol at the start of s.
func (k symbols) match(s string) (symbol, bool) {
	for _, known := range k {
		if rest, ok := strings.CutPrefix(s, known.name); ok && !continues(rest) {
			return known, true
		}
	}
	return symbol{}, false
}

// continues reports whether what follows a name belongs to a longer one.
func continues(rest string) bool {
	r, size := utf8.DecodeRuneInString(rest)
	if r == ',' { // within a symbol unless a space follows
		return size < len(rest) && rest[size] != ' '
	}
	return unicode.IsLetter(r) || unicode.IsDigit(r) || r == '\'' || r == '_' || r == '.'
}

// substitute puts the values into an expression and writes products out;
// empty if it has no symbol that is known.
func (k symbols) substitute(expression string) string {
	var b strings.Builder
	replaced := false
	operand := false // an operand has just ended
	space := false   // and a space follows it
	for s := expression; s != ""; {
		if s[0] == ' ' {
			space = true
			s = s[1:]
			continue
		}
		word, isOperand := s, true
		if known, ok := k.match(s); ok {
			word, s = known.value, s[len(known.name):]
			replaced = true
		} else {
			n := wordLength(s)
			word, s = s[:n], s[n:]
			isOperand = !strings.ContainsAny(word, "+-*/^√(),") || continues(word)
		}
		starts := isOperand || word == "(" || word == "√"
		switch {
		case operand && space && starts:
			b.WriteString(" × ")
		case space:
			b.WriteByte(' ')
		}
		b.WriteString(word)
		operand = isOperand && word != "min" && word != "max" || word == ")"
		space = false
	}
	if !replaced {
		return ""
	}
	return b.String()
}

// wordLength is the length of the number, name or sign at the start of s.
func wordLength(s string) int {
	n := 0
	for n < len(s) && continues(s[n:]) {
		_, size := utf8.DecodeRuneInString(s[n:])
		n += size
	}
	if n == 0 {
		_, n = utf8.DecodeRuneInString(s)
	}
	return n
}
