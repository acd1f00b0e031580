package units

import (
	"math"
	"strconv"
)

// digits is the number of significant digits printed. Twelve give back every
// text of up to twelve digits after any change of unit; the shortest text of
// the float64 would show 0.75 in as 0.7499999999999999.
const digits = 12

// lossless asks for as many digits as bring the float64 back bit by bit.
const lossless = 0

// Numbers from 1e-6 up to 1e15 are written without an exponent.
const (
	leastPlainExponent = -6
	mostPlainExponent  = 14
)

// appendNumber appends v rounded to the given number of significant digits,
// without trailing zeros; the result is a JSON number if v is finite.
func appendNumber(dst []byte, v float64, digits int) []byte {
	if !isFinite(v) {
		return strconv.AppendFloat(dst, v, 'g', -1, 64)
	}
	var scratch [32]byte
	s := strconv.AppendFloat(scratch[:0], v, 'e', digits-1, 64)
	if s[0] == '-' {
		s = s[1:]
		// Rounding to a fixed number of digits is for readers, who have
		// no use for a negative zero.
		if v != 0 || digits == lossless {
			dst = append(dst, '-')
		}
	}
	// s is d.ddde±xx, or de±xx if one digit was enough.
	e := len(s) - 1
	for s[e] != 'e' {
		e--
	}
	exponent := 0
	for _, c := range s[e+2:] {
		exponent = 10*exponent + int(c-'0')
	}
	if s[e+1] == '-' {
		exponent = -exponent
	}
	mantissa := s[:1]
	if e > 1 {
		s[1] = s[0]
		mantissa = s[1:e]
	}
	for len(mantissa) > 1 && mantissa[len(mantissa)-1] == '0' {
		mantissa = mantissa[:len(mantissa)-1]
	}

	point := exponent + 1 // digits before the decimal point
	switch {
	case exponent < leastPlainExponent || exponent > mostPlainExponent:
		dst = append(dst, mantissa[0])
		if len(mantissa) > 1 {
			dst = append(dst, '.')
			dst = append(dst, mantissa[1:]...)
		}
		dst = append(dst, 'e')
		return strconv.AppendInt(dst, int64(exponent), 10)
	case point <= 0:
		dst = append(dst, "0.000000"[:2-point]...)
		return append(dst, mantissa...)
	case point >= len(mantissa):
		dst = append(dst, mantissa...)
		for range point - len(mantissa) {
			dst = append(dst, '0')
		}
		return dst
	}
	dst = append(dst, mantissa[:point]...)
	dst = append(dst, '.')
	return append(dst, mantissa[point:]...)
}

// formatIn writes v, rounded for readers, and the symbol if there is one.
func formatIn(v float64, symbol string) string {
	var scratch [64]byte
	s := appendNumber(scratch[:0], v, digits)
	if symbol != "" {
		s = append(s, ' ')
		s = append(s, symbol...)
	}
	return string(s)
}

// The range of magnitudes that are read, in the unit of the text and in the SI
// unit; zero is read as well. It is far wider than anything built.
const (
	leastMagnitude = 1e-30
	mostMagnitude  = 1e30
)

// inRange reports whether v, finite or not, can be read back once written.
func inRange(v float64) bool {
	m := math.Abs(v)
	return v == 0 || m >= leastMagnitude && m <= mostMagnitude
}
