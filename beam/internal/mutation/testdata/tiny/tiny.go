// Package tiny is code to mutate: of each operator a few mutants that its tests
// kill, and some that they do not.
package tiny

import "math"

// rules is a table such as an edition has; both are read before any test runs.
type rules struct{ factor, unused float64 }

var table = rules{factor: 2, unused: 3}

// Most has both sides tested, and equality nowhere to be seen.
func Most(a, b int) int {
	if a < b {
		return b
	}
	return a
}

// Scaled reads the table.
func Scaled(x float64) float64 { return table.factor * x }

// Both is tested on three of its four rows.
func Both(a, b bool) bool { return a && b }

// Count is tested with what its loop counts.
func Count(n int) int {
	sum := 0
	for i := 0; i < n; i++ {
		sum += i
	}
	return sum
}

// Clamp is tested inside alone.
func Clamp(x float64) float64 { return math.Min(max(x, -1), 1) }

// Length is a quantity.
type Length struct{ m float64 }

// Add is the sum.
func (l Length) Add(k Length) Length { return Length{l.m + k.m} }

// Sub is the difference.
func (l Length) Sub(k Length) Length { return Length{l.m - k.m} }

// AtMost is the comparison.
func (l Length) AtMost(k Length) bool { return l.m <= k.m }

// Fits is tested on both sides and at its boundary.
func Fits(a, b, room Length) bool { return a.Add(b).AtMost(room) }

// Never is not called.
func Never(n int) int { return -n }

// Halvings hangs where its count never falls.
func Halvings(n int) (k int) {
	for n > 1 {
		n /= 2
		k++
	}
	return k
}

// Rare is true of one number in a hundred.
func Rare(n int) bool { return n == 57 }
