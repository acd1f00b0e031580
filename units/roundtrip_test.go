package units_test

import (
	"math/rand/v2"
	"runtime"
	"strconv"
	"sync"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/units"
)

// Text of up to 12 significant digits, read into SI and printed again in its
// own unit, must come back as it was: a million numbers in every unit.
func TestRoundTrip(t *testing.T) {
	const chunk = 10_000
	chunks := 100
	if testing.Short() {
		chunks = 1
	}
	seeds := make(chan int)
	faults := make([]string, chunks)
	var wg sync.WaitGroup
	for range runtime.GOMAXPROCS(0) {
		wg.Go(func() {
			for seed := range seeds {
				faults[seed] = roundTrip(uint64(seed), chunk)
			}
		})
	}
	for seed := range chunks {
		seeds <- seed
	}
	close(seeds)
	wg.Wait()
	for _, fault := range faults {
		require.Empty(t, fault)
	}
}

// roundTrip takes count random numbers through every unit and returns the
// first text that does not come back.
func roundTrip(seed uint64, count int) string {
	rng := rand.New(rand.NewPCG(seed, 12))
	rows := units.Table()
	buf := make([]byte, 0, 64)
	for range count {
		buf = appendRandomNumber(buf[:0], rng)
		number := len(buf)
		for i := range rows {
			row := &rows[i]
			buf = append(append(buf[:number], ' '), row.Symbol...)
			text := string(buf)
			a, err := units.ParseAmount(row.Dimension, text)
			if err != nil {
				return text + ": " + err.Error()
			}
			if back := units.SI.FormatIn(a, row.Symbol); back != text {
				return text + " came back as " + back
			}
		}
	}
	return ""
}

// appendRandomNumber appends a number of 1 to 12 significant digits from 1e-6
// up to 1e12, as a person would write it.
func appendRandomNumber(dst []byte, rng *rand.Rand) []byte {
	r := rng.Uint64()
	digits := 1 + int(r%12)
	r >>= 8
	if r&1 == 1 {
		dst = append(dst, '-')
	}
	mantissa := int64(1 + rng.Uint64N(pow10[digits]-1))
	for mantissa%10 == 0 {
		mantissa /= 10
	}
	var scratch [20]byte
	s := strconv.AppendInt(scratch[:0], mantissa, 10)
	// The point goes 5 places before the digits to as many after them as
	// leave the number below 1e12.
	switch point := int((r>>8)%18) - 5; {
	case point <= 0:
		dst = append(dst, "0.00000"[:2-point]...)
		dst = append(dst, s...)
	case point < len(s):
		dst = append(dst, s[:point]...)
		dst = append(dst, '.')
		dst = append(dst, s[point:]...)
	default:
		dst = append(dst, s...)
		dst = append(dst, "000000000000"[:point-len(s)]...)
	}
	return dst
}

var pow10 = func() (p [13]uint64) {
	p[0] = 1
	for i := 1; i < len(p); i++ {
		p[i] = 10 * p[i-1]
	}
	return p
}()

// The lossless forms bring every float64 back bit by bit.
func TestLossless(t *testing.T) {
	count := 200_000
	if testing.Short() {
		count /= 20
	}
	rng := rand.New(rand.NewPCG(1, 2))
	for range count {
		v := units.Metre.Of((rng.Float64() - 0.5) * float64(pow10[rng.IntN(13)]) / float64(pow10[rng.IntN(13)]))
		text, err := v.MarshalText()
		require.NoError(t, err)
		back, err := units.ParseLength(string(text))
		if err != nil || back != v {
			require.NoError(t, err)
			require.Equal(t, v, back, "%s", text)
		}
	}
}
