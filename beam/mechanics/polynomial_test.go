package mechanics

import (
	"math"
	"slices"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"
)

// withRoots multiplies out lead·Π(x - root).
func withRoots(lead float64, roots ...float64) polynomial {
	p := polynomial{lead}
	for n, r := range roots {
		for i := n + 1; i > 0; i-- {
			p[i] = p[i-1] - r*p[i]
		}
		p[0] *= -r
	}
	return p
}

func rootsOf(p polynomial, degree int, lo, hi float64) []float64 {
	b := p.bernstein(degree, lo, hi)
	return p.appendRoots(nil, &b, degree, lo, hi)
}

// Polynomials made from their roots give them back, and no others.
func TestRootsComeBack(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		degree := rapid.IntRange(2, maxDegree).Draw(t, "degree")
		roots := rapid.SliceOfNDistinct(rapid.IntRange(-40, 160), degree, degree, rapid.ID).Draw(t, "tenths")
		var all, inside []float64
		for _, r := range roots {
			x := float64(r)/10 + 0.05
			all = append(all, x)
			if x > 0 && x < 10 {
				inside = append(inside, x)
			}
		}
		slices.Sort(inside)
		slices.Reverse(inside)
		lead := rapid.SampledFrom([]float64{-3e6, 1, 2e-5}).Draw(t, "lead")
		got := rootsOf(withRoots(lead, all...), degree, 0, 10)
		require.Len(t, got, len(inside))
		for i := range got {
			require.InEpsilon(t, inside[i], got[i], 1e-9)
		}
	})
}

func TestRootsAtTheMiddleAndInPairs(t *testing.T) {
	// 5 is the middle of the interval, where the halves meet.
	require.Equal(t, []float64{5}, rootsOf(withRoots(1, 5, 20), 2, 0, 10))
	got := rootsOf(withRoots(1, 2, 5, 8), 3, 0, 10)
	require.Len(t, got, 3)
	require.InDeltaSlice(t, []float64{8, 5, 2}, got, 1e-12)
	require.Empty(t, rootsOf(polynomial{1, 0, 1}, 2, 0, 10), "no real root")
	double := rootsOf(withRoots(1, 3, 3, 7), 3, 0, 10)
	require.NotEmpty(t, double)
	require.InDelta(t, 7, double[0], 1e-9)
	for _, r := range double[1:] {
		require.InDelta(t, 3, r, 1e-6)
	}
}

// Bernstein coefficients describe the same polynomial: their ends are its ends,
// halving agrees with its values, and composing agrees with composing.
func TestBernsteinAndComposition(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		coefficient := rapid.Float64Range(-5, 5)
		var p polynomial
		degree := rapid.IntRange(2, maxDegree).Draw(t, "degree")
		for i := range degree + 1 {
			p[i] = coefficient.Draw(t, "coefficient")
		}
		lo := rapid.Float64Range(0, 3).Draw(t, "lo")
		hi := lo + rapid.Float64Range(0.1, 3).Draw(t, "width")
		b := p.bernstein(degree, lo, hi)
		size := 1e-12 * (1 + p.magnitude(hi))
		require.InDelta(t, p.at(lo), b[0], size)
		require.InDelta(t, p.at(hi), b[degree], size)
		lower, upper := b.halves(degree)
		require.InDelta(t, p.at((lo+hi)/2), lower[degree], size)
		require.InDelta(t, p.at((lo+hi)/2), upper[0], size)
		require.InDelta(t, p.at(lo), lower[0], size)
		require.InDelta(t, p.at(hi), upper[degree], size)

		for n := range maxDegree + 1 {
			q := p
			for i := n + 1; i <= maxDegree; i++ {
				q[i] = 0
			}
			k := hi
			for power := range min(3, maxDegree-n+1) {
				var sum polynomial
				sum.addComposed(&q, n, lo, 0.7, 2.5, power)
				factor := 2.5 * math.Pow(k, float64(power))
				require.InDelta(t, factor*q.at(lo-0.7*k), sum.at(k), 1e-11*factor*(1+q.magnitude(lo+0.7*k)))
			}
		}
		divided := p
		divided[0] = 0
		value := divided.at(hi)
		divided.divide()
		require.InDelta(t, value, hi*divided.at(hi), size)
		require.InDelta(t, p.slope(lo), (p.at(lo+1e-6)-p.at(lo-1e-6))/2e-6, 1e-3*(1+p.magnitude(hi)))
	})
}

// A root at the middle of an interval, but for its last bits, is none of the
// lower half: the search there finds the root that is.
func TestRootNextToAnEndDoesNotHideAnother(t *testing.T) {
	for _, tenths := range [][]float64{{5, 12, -31}, {84, 87, -2, -5}} {
		var roots []float64
		for _, r := range tenths {
			roots = append(roots, r/10+0.05)
		}
		got := rootsOf(withRoots(1, roots...), len(roots), 0, 10)
		slices.Sort(got)
		require.InDeltaSlice(t, roots[:2], got, 1e-9)
	}
}

func TestRootBound(t *testing.T) {
	require.Zero(t, (&polynomial{3}).rootBound())
	for _, p := range []polynomial{withRoots(1, 50, 2), withRoots(-2, 0.1, 900, 3), withRoots(4, 1, 2, 3, 77)} {
		bound := p.rootBound()
		require.GreaterOrEqual(t, bound, 50.0)
		require.False(t, math.IsInf(bound, 0))
	}
}
