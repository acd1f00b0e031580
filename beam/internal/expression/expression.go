// Package expression computes the expressions of a working again, from
// nothing but their text and the values of their symbols. It stands apart
// from the code that made the values and from the code that prints them, so
// that tests can hold both against it.
//
// Expressions use + - * / ^ √ min max, brackets, numbers, a space or × for a
// product, and symbols. Products and quotients are taken from left to right. A
// comma between arguments is followed by a space, one within a symbol is not.
package expression

import (
	"fmt"
	"math"
	"strconv"
	"strings"
	"unicode"
	"unicode/utf8"
)

// Evaluate computes an expression with the values of known symbols.
func Evaluate(expression string, known map[string]float64) (v float64, err error) {
	p := &parser{rest: []rune(expression), known: known}
	defer func() {
		if r := recover(); r != nil {
			err = fmt.Errorf("%q: %v", expression, r)
		}
	}()
	v = p.sum()
	if p.skip(); len(p.rest) > 0 {
		return 0, fmt.Errorf("%q: cannot read %q", expression, string(p.rest))
	}
	return v, nil
}

type parser struct {
	rest  []rune
	known map[string]float64
}

func (p *parser) skip() {
	for len(p.rest) > 0 && p.rest[0] == ' ' {
		p.rest = p.rest[1:]
	}
}

// take passes over a sign if it comes next.
func (p *parser) take(sign rune) bool {
	p.skip()
	if len(p.rest) > 0 && p.rest[0] == sign {
		p.rest = p.rest[1:]
		return true
	}
	return false
}

func (p *parser) sum() float64 {
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

func (p *parser) product() float64 {
	v := p.signed()
	for {
		switch {
		case p.take('*'), p.take('×'):
			v *= p.signed()
		case p.take('/'):
			v /= p.signed()
		default:
			p.skip()
			if len(p.rest) == 0 || strings.ContainsRune("+-),^", p.rest[0]) {
				return v
			}
			v *= p.power()
		}
	}
}

func (p *parser) signed() float64 {
	if p.take('-') {
		return -p.power()
	}
	return p.power()
}

func (p *parser) power() float64 {
	v := p.atom()
	if p.take('^') {
		return math.Pow(v, p.signed())
	}
	return v
}

func (p *parser) atom() float64 {
	p.skip()
	switch {
	case p.take('√'):
		return math.Sqrt(p.atom())
	case p.take('('):
		v := p.sum()
		if !p.take(')') {
			panic("bracket not closed")
		}
		return v
	}
	// The longest known symbol that is not the start of a longer word.
	text := string(p.rest)
	best := ""
	for name := range p.known {
		if len(name) > len(best) && strings.HasPrefix(text, name) && !goesOn(text[len(name):]) {
			best = name
		}
	}
	if best != "" {
		p.rest = []rune(text[len(best):])
		return p.known[best]
	}
	n := 0
	for n < len(text) && (text[n] == '.' || text[n] >= '0' && text[n] <= '9' || n > 0 && text[n-1] == 'e' && text[n] == '-' || n > 0 && text[n] == 'e') {
		n++
	}
	if v, err := strconv.ParseFloat(text[:n], 64); err == nil {
		p.rest = []rune(text[n:])
		return v
	}
	for _, name := range []string{"min", "max"} {
		if rest, ok := strings.CutPrefix(text, name+"("); ok {
			p.rest = []rune(rest)
			v := p.sum()
			for p.take(',') {
				if name == "min" {
					v = min(v, p.sum())
				} else {
					v = max(v, p.sum())
				}
			}
			if !p.take(')') {
				panic("arguments not closed")
			}
			return v
		}
	}
	panic(fmt.Sprintf("no value at %q", text))
}

func goesOn(rest string) bool {
	if strings.HasPrefix(rest, ",") {
		return len(rest) > 1 && rest[1] != ' '
	}
	r, _ := utf8.DecodeRuneInString(rest)
	return unicode.IsLetter(r) || unicode.IsDigit(r) || r == '\'' || r == '_' || r == '.'
}
