package units

import (
	"bytes"
	"encoding/json"
	"fmt"
	"math"
)

// A System picks the units that amounts are printed in: one for each
// dimension. The zero value is SI.
type System uint8

// The systems.
const (
	SI System = iota // mm, mm2, kN, kN-m, MPa, ...
	US               // in, in2, kip, kip-ft, ksi, ...
)

// ParseSystem reads "si" or "us".
func ParseSystem(text string) (System, error) {
	switch text {
	case "si":
		return SI, nil
	case "us":
		return US, nil
	}
	return 0, fmt.Errorf(`must be "si" or "us", not %.32q`, text)
}

// String returns "si" or "us".
func (s System) String() string {
	switch s {
	case SI:
		return "si"
	case US:
		return "us"
	}
	return "unknown system"
}

// MarshalText returns the text of String.
func (s System) MarshalText() ([]byte, error) {
	if s > US {
		return nil, fmt.Errorf("units: no system %d", uint8(s))
	}
	return []byte(s.String()), nil
}

// UnmarshalText is [ParseSystem] as a method.
func (s *System) UnmarshalText(text []byte) error {
	v, err := ParseSystem(string(text))
	if err == nil {
		*s = v
	}
	return err
}

// Unit returns the symbol of the unit in which s prints dimension d, empty for
// plain numbers.
func (s System) Unit(d Dimension) string {
	if u := s.unit(d); u != nil {
		return u.symbol
	}
	return ""
}

func (s System) unit(d Dimension) *unit {
	if s > US || int(d) >= len(catalog) || d == None {
		return nil
	}
	return &catalog[d].units[catalog[d].preferred[s]]
}

// pick returns the number and symbol of a in the unit of the given symbol, or
// in that of s if a's dimension has no such unit.
func (s System) pick(a Amount, symbol string) (float64, string) {
	u, ok := a.dim.find(symbol)
	if !ok {
		u = s.unit(a.dim)
	}
	if u == nil {
		return a.si, ""
	}
	return a.si / u.factor, u.symbol
}

// Float returns a in the unit of s.
func (s System) Float(a Amount) float64 {
	v, _ := s.pick(a, "")
	return v
}

// Format returns a in the unit of s with its symbol, at 12 significant digits
// and without trailing zeros: "24 in". Numbers below 1e-6 or from 1e15 on have
// an exponent.
func (s System) Format(a Amount) string { return formatIn(s.pick(a, "")) }

// FormatIn is Format in the unit of the given symbol, where a's dimension has
// that unit; otherwise it is Format.
func (s System) FormatIn(a Amount, symbol string) string { return formatIn(s.pick(a, symbol)) }

// Express returns a in the unit of s, rounded to 12 significant digits.
func (s System) Express(a Amount) Measure { return expressIn(s.pick(a, "")) }

// ExpressIn is Express in the unit of the given symbol, where a's dimension
// has that unit; otherwise it is Express.
func (s System) ExpressIn(a Amount, symbol string) Measure { return expressIn(s.pick(a, symbol)) }

// A Measure is an amount as a reader sees it: a number of at most 12
// significant digits and the symbol of its unit, empty for plain numbers. In
// JSON it is {"value": 24, "unit": "in"}, or a number if it has no unit.
type Measure struct {
	Number json.Number
	Unit   string
}

func expressIn(v float64, symbol string) Measure {
	var scratch [32]byte
	return Measure{json.Number(appendNumber(scratch[:0], v, digits)), symbol}
}

// String returns the number and the unit, "24 in".
func (m Measure) String() string {
	if m.Unit == "" {
		return m.Number.String()
	}
	return m.Number.String() + " " + m.Unit
}

// MarshalJSON implements [json.Marshaler]. It fails if the number is not one
// that JSON can hold.
func (m Measure) MarshalJSON() ([]byte, error) {
	if !isJSONNumber(string(m.Number)) {
		return nil, fmt.Errorf("units: %.32q cannot be written as a number", string(m.Number))
	}
	if m.Unit == "" {
		return []byte(m.Number), nil
	}
	return appendObject(nil, []byte(m.Number), m.Unit), nil
}

// UnmarshalJSON reads what MarshalJSON writes. It takes any unit; amounts are
// read by [AmountOf].
func (m *Measure) UnmarshalJSON(data []byte) error {
	data = bytes.Trim(data, jsonSpace)
	if isJSONNumber(string(data)) {
		*m = Measure{Number: json.Number(data)}
		return nil
	}
	number, symbol, err := readObject(data)
	if err != nil {
		return err
	}
	*m = Measure{json.Number(number), symbol}
	return nil
}

// A Series is a list of amounts of one dimension as a reader sees it. In JSON
// it is {"unit": "kip-ft", "values": [...]} with at most 12 significant digits
// a number; plain numbers have no "unit".
type Series struct {
	Unit   string
	Values []float64
}

// SeriesOf returns quantities of one type in the unit of s. Amounts of a
// different dimension than the first become NaN, which JSON refuses.
func SeriesOf[Q interface{ Amount() Amount }](s System, list []Q) Series {
	var first Q
	if len(list) > 0 {
		first = list[0]
	}
	d := first.Amount().dim
	out := Series{Unit: s.Unit(d), Values: make([]float64, len(list))}
	for i, q := range list {
		a := q.Amount()
		if a.dim != d {
			a.si = math.NaN()
		}
		out.Values[i] = s.Float(a)
	}
	return out
}

// MarshalJSON implements [json.Marshaler]. It fails if a value is not finite.
func (s Series) MarshalJSON() ([]byte, error) {
	b := make([]byte, 0, 24+12*len(s.Values))
	b = append(b, '{')
	if s.Unit != "" {
		b = append(b, `"unit":`...)
		b = appendString(b, s.Unit)
		b = append(b, ',')
	}
	b = append(b, `"values":[`...)
	for i, v := range s.Values {
		if !isFinite(v) {
			return nil, fmt.Errorf("units: value %d of a series is %v", i, v)
		}
		if i > 0 {
			b = append(b, ',')
		}
		b = appendNumber(b, v, digits)
	}
	return append(b, "]}"...), nil
}
