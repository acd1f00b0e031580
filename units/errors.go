package units

import (
	"fmt"
	"strings"
)

// A ParseError says why a text or a JSON value is not a quantity.
type ParseError struct {
	Text      string    // what was read, cut to the length that is read
	Dimension Dimension // what was wanted
	// Reason is a clause without subject, so that a field name put before it
	// makes the sentence: width + " " + `needs a unit, e.g. "14 in" or "350 mm"`.
	Reason   string
	Accepted []string // symbols of the units of Dimension
}

// Error returns the reason.
func (e *ParseError) Error() string { return e.Reason }

func refuse(d Dimension, text, format string, args ...any) *ParseError {
	if len(text) > maxText {
		text = strings.ToValidUTF8(text[:maxText], "")
	}
	return &ParseError{
		Text:      text,
		Dimension: d,
		Reason:    fmt.Sprintf(format, args...),
		Accepted:  d.Units(),
	}
}

// example quotes how the quantities of d are written.
func example(d Dimension) string {
	e := d.Examples()
	return fmt.Sprintf("%q or %q", e[0], e[1])
}

func needsUnit(d Dimension, text string) *ParseError {
	return refuse(d, text, "needs a unit, e.g. %s", example(d))
}

// wrongUnit tells a unit of another dimension from one that is unknown.
func wrongUnit(d Dimension, text, symbol string) *ParseError {
	if len(symbol) > maxText {
		symbol = strings.ToValidUTF8(symbol[:maxText], "")
	}
	if d == None {
		return refuse(d, text, "is a plain number and takes no unit; %q is not read", symbol)
	}
	accepted := d.Units()
	list := orList(accepted)
	var others []string
	for other := range catalog {
		if _, ok := Dimension(other).find(symbol); ok {
			others = append(others, catalog[other].name)
		}
	}
	if len(others) > 0 {
		return refuse(d, text, "has the unit %q, which is of %s; units of %s are %s", symbol, orList(others), d, list)
	}
	if i := strings.LastIndexByte(symbol, '/'); i > 0 {
		_, whole := d.find(symbol[:i])
		if _, per := DimLength.find(symbol[i+1:]); whole && per {
			return refuse(d, text, "has the unit %q, which is of %s over length (multiply by the length that it acts on); units of %s are %s", symbol, d, d, list)
		}
	}
	for _, s := range accepted {
		if strings.EqualFold(s, symbol) {
			return refuse(d, text, "has the unknown unit %q (write %q: symbols are case-sensitive); units of %s are %s", symbol, s, d, list)
		}
	}
	return refuse(d, text, "has the unknown unit %q; units of %s are %s", symbol, d, list)
}

// orList joins words as "a, b or c".
func orList(words []string) string {
	if len(words) < 2 {
		return strings.Join(words, "")
	}
	last := len(words) - 1
	return strings.Join(words[:last], ", ") + " or " + words[last]
}
