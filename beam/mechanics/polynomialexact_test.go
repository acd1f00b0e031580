package mechanics

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"
)

// binomial returns n over k.
func binomial(n, k int) float64 {
	c := 1.0
	for i := range k {
		c = c * float64(n-i) / float64(i+1)
	}
	return c
}

// primes are coefficients no two of which can be mixed up; arithmetic with them is
// exact.
var primes = polynomial{-7, 11, -13, 17, 19, -23}

func upTo(p polynomial, degree int) polynomial {
	for i := degree + 1; i <= maxDegree; i++ {
		p[i] = 0
	}
	return p
}

// The values of polynomials of integers at integers are exact.
func TestPolynomialValues(t *testing.T) {
	for _, x := range []float64{0, 1, -1, 2, -3, 5} {
		var value, slope, magnitude float64
		for i, c := range primes {
			value += c * math.Pow(x, float64(i))
			magnitude += math.Abs(c * math.Pow(x, float64(i)))
			if i > 0 {
				slope += float64(i) * c * math.Pow(x, float64(i-1))
			}
		}
		require.Equal(t, value, primes.at(x))
		require.Equal(t, slope, primes.slope(x))
		require.Equal(t, magnitude, primes.magnitude(x))
	}
}

// The definition of the Bernstein coefficients, by Taylor's at the lower end: b(i)
// = Σ C(i,j)/C(n,j)·w^j·p⁽ʲ⁾(lo)/j!.
func TestBernsteinByItsDefinition(t *testing.T) {
	for degree := 2; degree <= maxDegree; degree++ {
		p := upTo(primes, degree)
		for _, ends := range [][2]float64{{0, 1}, {0, 2}, {1, 2}, {1, 4}, {3, 3.5}} {
			lo, w := ends[0], ends[1]-ends[0]
			var taylor polynomial
			for j := range taylor {
				for i := j; i <= degree; i++ {
					taylor[j] += binomial(i, j) * p[i] * math.Pow(lo, float64(i-j)) * math.Pow(w, float64(j))
				}
			}
			b := p.bernstein(degree, lo, ends[1])
			for i := range degree + 1 {
				want := 0.0
				for j := range i + 1 {
					want += binomial(i, j) / binomial(degree, j) * taylor[j]
				}
				require.InDelta(t, want, b[i], 1e-13*p.magnitude(ends[1])*math.Pow(1+w, 5), "degree %d, %v, coefficient %d", degree, ends, i)
			}
			require.Equal(t, upTo(b, degree), b)

			lower, upper := b.halves(degree)
			mid := lo + w/2
			for i, want := range p.bernstein(degree, lo, mid) {
				require.InDelta(t, want, lower[i], 1e-13*p.magnitude(ends[1])*math.Pow(1+w, 5))
			}
			for i, want := range p.bernstein(degree, mid, ends[1]) {
				require.InDelta(t, want, upper[i], 1e-13*p.magnitude(ends[1])*math.Pow(1+w, 5))
			}
		}
	}
}

// q(a - x·k) multiplied out by the binomial theorem.
func TestCompositionByTheBinomialTheorem(t *testing.T) {
	const a, x, weight = 3.0, 2.0, 5.0
	for degree := range maxDegree + 1 {
		for power := range min(3, maxDegree-degree+1) {
			want := polynomial{1, 2, 3, 4, 5, 6}
			for j := range degree + 1 {
				for i := range j + 1 {
					want[power+i] += weight * primes[j] * binomial(j, i) * math.Pow(a, float64(j-i)) * math.Pow(-x, float64(i))
				}
			}
			got := polynomial{1, 2, 3, 4, 5, 6}
			got.addComposed(&primes, degree, a, x, weight, power)
			require.Equal(t, want, got, "degree %d, power %d", degree, power)
		}
	}
}

func TestDivision(t *testing.T) {
	p := polynomial{1e-9, 2, 3, 4, 5, 6}
	p.divide()
	require.Equal(t, polynomial{2, 3, 4, 5, 6, 0}, p)
}

// Cauchy's bound is one and the greatest coefficient over the leading one.
func TestCauchysBound(t *testing.T) {
	for _, test := range []struct {
		p    polynomial
		want float64
	}{
		{polynomial{}, 0},
		{polynomial{5}, 0},
		{polynomial{-6, 2}, 4},
		{polynomial{6, -2}, 4},
		{polynomial{1, -8, 2}, 5},
		{polynomial{1, 1, 1, 1, 1, -1}, 2},
		{polynomial{3, 1, 1, 1, 0.5}, 7},
		{polynomial{0, 0, 0, 0, 7}, 1},
	} {
		require.Equal(t, test.want, test.p.rootBound(), "%v", test.p)
	}
}

// Descartes' rule leaves zeros out.
func TestSignChanges(t *testing.T) {
	for _, test := range []struct {
		p      polynomial
		degree int
		want   int
	}{
		{polynomial{}, 5, 0},
		{polynomial{1, 2, 3, 4, 5, 6}, 5, 0},
		{polynomial{-1, -2, -3, -4, -5, -6}, 5, 0},
		{polynomial{1, -2, 3, -4, 5, -6}, 5, 5},
		{polynomial{-1, 2, -3, 4, -5, 6}, 5, 5},
		{polynomial{-1, 2, -3, 4, -5, 6}, 2, 2},
		{polynomial{0, 0, -3}, 2, 0},
		{polynomial{0, -3, 0, 2}, 3, 1},
		{polynomial{0, 3, 0, -2}, 3, 1},
		{polynomial{1, 0, 1, 0, -1, 0}, 5, 1},
		{polynomial{1, 1, 1, -1}, 2, 0},
		{polynomial{1, 1, 1, -1}, 3, 1},
	} {
		require.Equal(t, test.want, test.p.signChanges(test.degree), "%v to %d", test.p, test.degree)
	}
}

// Roots come back to their last bits, wherever they lie in the interval.
func TestRootsToTheLastBit(t *testing.T) {
	for _, test := range []struct {
		name   string
		p      polynomial
		degree int
		lo, hi float64
		want   []float64

		together bool // roots of order n keep an nth of their digits
	}{
		{"line", polynomial{-6, 2}, 2, 0, 8, []float64{3}, false},
		{"line that falls", polynomial{6, -2}, 2, 0, 8, []float64{3}, false},
		{"quadratic of unlike ends", withRoots(1, -4, 3), 2, 0, 8, []float64{3}, false},
		{"its other branch", withRoots(1, 3, -1), 2, 0, 8, []float64{3}, false},
		{"its negative", withRoots(-1, 3, -1), 2, 0, 8, []float64{3}, false},
		{"its other negative", withRoots(-1, 3, -4), 2, 0, 8, []float64{3}, false},
		{"quadratic of two roots, one inside", withRoots(1, 3, 12), 2, 0, 8, []float64{3}, false},
		{"the other inside", withRoots(1, 3, 12), 2, 8, 16, []float64{12}, false},
		{"both inside", withRoots(1, 3, 12), 2, 2, 16, []float64{12, 3}, false},
		{"both inside, falling", withRoots(-1, 3, 12), 2, 2, 16, []float64{12, 3}, false},
		{"two far apart", withRoots(1, 1, 1024), 2, 0.5, 2048, []float64{1024, 1}, false},
		{"none inside", withRoots(1, 3, 12), 2, 4, 11, nil, false},
		{"none real", polynomial{1, 0, 1}, 2, -4, 4, nil, false},
		{"pure square", polynomial{-9, 0, 1}, 2, 0, 8, []float64{3}, false},
		{"cubic", withRoots(1, 1, 3, 12), 3, 0, 16, []float64{12, 3, 1}, false},
		{"cubic that falls", withRoots(-2, 1, 3, 12), 3, 0, 16, []float64{12, 3, 1}, false},
		{"cubic with a root at the middle", withRoots(1, 1, 8, 12), 3, 0, 16, []float64{12, 8, 1}, false},
		{"quartic", withRoots(3, 1, 3, 7, 12), 4, 0, 16, []float64{12, 7, 3, 1}, false},
		{"quintic", withRoots(-5, 1, 3, 7, 9, 12), 5, 0, 16, []float64{12, 9, 7, 3, 1}, false},
		{"quintic, some outside", withRoots(-5, 1, 3, 7, 9, 12), 5, 2, 8, []float64{7, 3}, false},
		{"a root at the lower end is not inside", withRoots(1, 2, 5, 20), 3, 2, 8, []float64{5}, false},
		{"nor one at the upper end", withRoots(1, 5, 8, 20), 3, 2, 8, []float64{5}, false},
		{"level at the root", withRoots(1, 3, 3, 3), 3, 0, 8, []float64{3}, true},
		{"a pair", withRoots(1, 3, 3), 2, 0, 8, []float64{3}, true},
		{"a pair that just misses", polynomial{9 + 1e-9, -6, 1}, 2, 0, 8, nil, true},
		{"a pair at the middle", withRoots(1, 4, 4), 2, 0, 8, []float64{4}, true},
	} {
		t.Run(test.name, func(t *testing.T) {
			got := rootsOf(test.p, test.degree, test.lo, test.hi)
			require.Len(t, got, len(test.want), "%v", got)
			within := 32 * 0x1p-52
			if test.together {
				within = 1e-5
			}
			for i := range got {
				require.InEpsilon(t, test.want[i], got[i], within)
			}
		})
	}
}
