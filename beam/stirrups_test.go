package beam

import (
	"testing"

	"github.com/stretchr/testify/require"
)

// The searches for a limit find it from any guess, and say so where there is
// none; least is then the last one tried.
func TestSearchesForALimit(t *testing.T) {
	for limit := 3; limit <= 21; limit++ { // the greatest that passes; below 4: none
		for guess := 4; guess <= 20; guess++ {
			tried := 0
			k, ok := lastNear(guess, 4, 20, func(k int) bool { tried = k; return k <= limit })
			require.Equal(t, limit >= 4, ok)
			if ok {
				require.Equal(t, min(limit, 20), k, "from %d", guess)
			} else {
				require.Equal(t, 4, tried)
			}
		}
	}
	for least := 0; least <= 20; least++ {
		require.Equal(t, least, shrink(20, func(n int) bool { return n >= least }))
		require.Equal(t, least, last(0, 20, func(n int) bool { return n <= least }))
	}
}
