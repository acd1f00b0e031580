package tiny

import (
	"testing"

	"pgregory.net/rapid"
)

// A property that only many checks can break: one number in a hundred is rare.
func TestRare(t *testing.T) {
	rapid.Check(t, func(r *rapid.T) {
		n := rapid.IntRange(0, 99).Draw(r, "n")
		if Rare(n) != (n%100 == 57) {
			r.Fatal("Rare")
		}
	})
}
