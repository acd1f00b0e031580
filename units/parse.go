package units

import (
	"math"
	"strconv"
	"strings"
	"unicode/utf8"

	"github.com/shopspring/decimal"
)

// Bounds on what is read, checked before any arithmetic.
const (
	maxText     = 64 // bytes of a whole text
	maxNumber   = 40 // bytes of one number
	maxInteger  = 8  // digits of a whole number beside a fraction or before "ft"
	maxFraction = 6  // digits of a numerator or denominator
	maxExponent = 99
)

// parse reads text as a quantity of dimension d and returns it in the SI unit.
//
// The forms are a number and a symbol, with or without spaces between them
// ("24 in", "24in", "3/4 in", "1 1/2 in", "1.5e3 psi"), and for lengths feet
// and inches ("26 ft 6 in", "5 ft 3 1/2 in").
func parse(d Dimension, text string) (float64, error) {
	if len(text) > maxText {
		return 0, refuse(d, text, "is %d bytes long; at most %d are read, e.g. %s", len(text), maxText, example(d))
	}
	for i := range len(text) {
		if c := text[i]; c < ' ' || c > '~' {
			r, _ := utf8.DecodeRuneInString(text[i:])
			return 0, refuse(d, text, "has the character %+q; write it in plain ASCII, e.g. %s", r, example(d))
		}
	}
	s := strings.Trim(text, " ")
	if s == "" {
		return 0, refuse(d, text, "is empty; write e.g. %s", example(d))
	}
	n, rest, fault := scanNumber(s)
	if fault != "" {
		return 0, refuse(d, text, "%s; write e.g. %s", fault, example(d))
	}
	symbol := strings.TrimLeft(rest, " ")
	if d == None {
		if symbol != "" {
			return 0, wrongUnit(d, text, symbol)
		}
		return scaled(d, text, n.value(), 1)
	}
	if symbol == "" {
		return 0, needsUnit(d, text)
	}
	if u, ok := d.find(symbol); ok {
		return scaled(d, text, n.value(), u.factor)
	}
	if inches, ok := strings.CutPrefix(symbol, Foot.String()); ok && d == DimLength {
		inches = strings.TrimLeft(inches, " ")
		if strings.ContainsAny(inches, "0123456789") && strings.IndexByte("0123456789.+-", inches[0]) >= 0 {
			return feetAndInches(text, n, inches)
		}
	}
	return 0, wrongUnit(d, text, symbol)
}

// feetAndInches adds inches, the text after "ft", to a whole number of feet.
// The sum is taken exactly, so that it is rounded once.
func feetAndInches(text string, feet number, inches string) (float64, error) {
	if !feet.whole() {
		return 0, refuse(DimLength, text, `has feet before its inches that are not a whole number of at most %d digits; write e.g. "26 ft 6 in"`, maxInteger)
	}
	n, rest, fault := scanNumber(inches)
	switch symbol := strings.TrimLeft(rest, " "); {
	case fault != "":
		return 0, refuse(DimLength, text, `has inches where "%s" %s; write e.g. "26 ft 6 in"`, inches, fault)
	case symbol != Inch.String():
		return 0, refuse(DimLength, text, `has something other than inches after its feet; write e.g. "26 ft 6 in"`)
	case n.signed || n.value() >= 12:
		return 0, refuse(DimLength, text, `has inches after its feet that are signed or not below 12; write e.g. "26 ft 6 in"`)
	}
	whole := 12 * feet.integer
	var total float64
	switch {
	case n.den > 0:
		n.integer += whole
		total = n.value()
	case n.whole():
		total = float64(whole + n.integer)
	default:
		part, err := decimal.NewFromString(n.text)
		if err != nil {
			return 0, refuse(DimLength, text, `has inches that are not a number; write e.g. "26 ft 6 in"`)
		}
		total = part.Add(decimal.NewFromInt(whole)).InexactFloat64()
	}
	if feet.negative {
		total = -total
	}
	return scaled(DimLength, text, total, inch)
}

// valueOf reads a number written as in JSON, in the unit of the given symbol.
func valueOf(d Dimension, value, symbol string) (float64, error) {
	text := strings.TrimRight(value+" "+symbol, " ")
	switch {
	case len(value) > maxNumber || !isJSONNumber(value):
		return 0, refuse(d, text, "has a value that is not a number of at most %d characters, e.g. %s", maxNumber, example(d))
	case symbol == "" && d != None:
		return 0, needsUnit(d, text)
	}
	factor := 1.0
	if symbol != "" {
		u, ok := d.find(symbol)
		if !ok {
			return 0, wrongUnit(d, text, symbol)
		}
		factor = u.factor
	}
	n, _, fault := scanNumber(value)
	if fault != "" {
		return 0, refuse(d, text, "%s; write e.g. %s", fault, example(d))
	}
	return scaled(d, text, n.value(), factor)
}

// scaled returns v times factor, if both are in the range that is read.
func scaled(d Dimension, text string, v, factor float64) (float64, error) {
	si := v * factor
	if !inRange(v) || !inRange(si) {
		return 0, refuse(d, text, "is out of range; magnitudes from %g to %g are read", leastMagnitude, mostMagnitude)
	}
	return si, nil
}

// A number is a scanned number: a decimal, or if den is not zero a fraction
// with or without a whole number before it.
type number struct {
	text              string // of the decimal, with its sign
	integer, num, den int64
	negative, signed  bool
}

// whole reports whether n was written as a whole number.
func (n number) whole() bool {
	return n.den == 0 && n.integer >= 0
}

// value returns n rounded once. A fraction's whole numerator and denominator
// are below 2^53, so the quotient of their float64s is correctly rounded.
func (n number) value() float64 {
	if n.den != 0 {
		v := float64(n.integer*n.den+n.num) / float64(n.den)
		if n.negative {
			return -v
		}
		return v
	}
	v, err := strconv.ParseFloat(n.text, 64)
	if err != nil {
		return math.Inf(1) // beyond float64, hence out of the range read
	}
	return v
}

// scanNumber reads the number at the start of s and returns what follows it.
// A fault is a clause for an error message, and empty if there is none.
func scanNumber(s string) (n number, rest, fault string) {
	i := 0
	if s != "" && (s[0] == '-' || s[0] == '+') {
		n.signed, n.negative = true, s[0] == '-'
		i = 1
	}
	start := i
	i += countDigits(s[i:])
	integer := s[start:i]

	// The whole number may be a numerator, or be followed by a fraction.
	if integer != "" {
		if num, den, end, ok := scanFraction(s[start:]); ok {
			return fraction(n, "0", num, den, s[start+end:])
		}
		if gap := countSpaces(s[i:]); gap > 0 {
			if num, den, end, ok := scanFraction(s[i+gap:]); ok {
				return fraction(n, integer, num, den, s[i+gap+end:])
			}
		}
	}

	wholeOnly := true
	if i < len(s) && s[i] == '.' {
		decimals := countDigits(s[i+1:])
		if integer != "" || decimals > 0 {
			i += 1 + decimals
			wholeOnly = false
		}
	}
	if i == start {
		return n, s, "does not begin with a number"
	}
	if i < len(s) && (s[i] == 'e' || s[i] == 'E') {
		j := i + 1
		if j < len(s) && (s[j] == '-' || s[j] == '+') {
			j++
		}
		if k := countDigits(s[j:]); k > 0 {
			if e, err := strconv.Atoi(s[j : j+k]); err != nil || e > maxExponent {
				return n, s, "has an exponent beyond " + strconv.Itoa(maxExponent)
			}
			i = j + k
			wholeOnly = false
		}
	}
	if i < len(s) && (s[i] == ',' || s[i] == '_' || s[i] == '.' || s[i] == '\'') {
		return n, s, "has " + strconv.Quote(s[i:i+1]) + " in its number, which is written with digits and one decimal point"
	}
	if i > maxNumber {
		return n, s, "has a number of more than " + strconv.Itoa(maxNumber) + " characters"
	}
	n.text, n.integer = s[:i], -1
	if wholeOnly && len(integer) <= maxInteger {
		n.integer = atoi(integer)
	}
	return n, s[i:], ""
}

// fraction completes n as integer + num/den.
func fraction(n number, integer, num, den, rest string) (number, string, string) {
	if len(integer) > maxInteger || len(num) > maxFraction || len(den) > maxFraction {
		return n, rest, "has a fraction with more digits than are read (" +
			strconv.Itoa(maxInteger) + " before it, " + strconv.Itoa(maxFraction) + " in each part)"
	}
	n.integer, n.num, n.den = atoi(integer), atoi(num), atoi(den)
	if n.den == 0 {
		return n, rest, "has a fraction over zero"
	}
	if rest != "" && rest[0] == '.' {
		return n, rest, "has a fraction of numbers that are not whole"
	}
	return n, rest, ""
}

// scanFraction reads digits/digits at the start of s.
func scanFraction(s string) (num, den string, end int, ok bool) {
	i := countDigits(s)
	if i == 0 || i == len(s) || s[i] != '/' {
		return "", "", 0, false
	}
	j := i + 1
	k := countDigits(s[j:])
	return s[:i], s[j : j+k], j + k, k > 0
}

func countDigits(s string) int {
	i := 0
	for i < len(s) && '0' <= s[i] && s[i] <= '9' {
		i++
	}
	return i
}

func countSpaces(s string) int { return len(s) - len(strings.TrimLeft(s, " ")) }

// atoi reads digits that are too few to overflow.
func atoi(digits string) int64 {
	v := int64(0)
	for _, c := range []byte(digits) {
		v = 10*v + int64(c-'0')
	}
	return v
}
