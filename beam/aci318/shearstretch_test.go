package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"
)

// A beam fixed at both ends under an even load has its points of contraflexure
// 0.2113 L from the ends (AISC Steel Construction Manual, Table 3-23, case 15),
// exactly L (1/2 - 1/√12).
func TestContraflexureOfAFixedBeam(t *testing.T) {
	const w, l = 3.0, 8.0
	p := newShearStretch(l, -w*l*l/12, w*l/2, -w*l*l/12, -w*l/2)
	parts, n := p.parts()
	require.Equal(t, 3, n)
	x := l * (0.5 - 1/math.Sqrt(12))
	require.InDelta(t, 0.2113, x/l, 5e-5)
	for i, want := range []signedPart{{0, x, -1}, {x, l - x, 1}, {l - x, l, -1}} {
		require.Equal(t, want.sign, parts[i].sign)
		require.InDelta(t, want.from, parts[i].from, 1e-9)
		require.InDelta(t, want.to, parts[i].to, 1e-9)
	}
	_, ok := p.vertex(0, l)
	require.False(t, ok, "the shear is a straight line")
}

// Moments that vanish at an end by rounding give no part of the wrong sense:
// a simple span is bent in one sense from end to end.
func TestRoundingAtASupportIsNoContraflexure(t *testing.T) {
	for _, noise := range []float64{-1e-12, 0, 1e-12} {
		p := newShearStretch(8, noise, 12, -noise, -12)
		parts, n := p.parts()
		require.Equal(t, 1, n)
		require.Equal(t, signedPart{0, 8, 1}, parts[0])
	}
	p := newShearStretch(8, 0, 0, 0, 0)
	parts, n := p.parts()
	require.Equal(t, 1, n)
	require.Equal(t, signedPart{0, 8, 0}, parts[0])
}

// A load that changes its sign along the stretch has its extreme shear inside.
func TestExtremeShearInsideAStretch(t *testing.T) {
	// Load from 6 down to -6 over 4: V = 1 - 6t + 1.5 t2, least at t = 2.
	shear := func(t float64) float64 { return 1 - 6*t + 1.5*t*t }
	moment := func(t float64) float64 { return 5 + t - 3*t*t + 0.5*t*t*t }
	p := newShearStretch(4, moment(0), shear(0), moment(4), shear(4))
	x, ok := p.vertex(0, 4)
	require.True(t, ok)
	require.InDelta(t, 2, x, 1e-12)
	require.InDelta(t, shear(2), p.shear(x), 1e-12)
}

// The stretch is the cubic that its end forces come from, and its parts carry
// the sign of its moment.
func TestStretchIsExact(t *testing.T) {
	rapid.Check(t, func(r *rapid.T) {
		c := func(name string) float64 { return rapid.Float64Range(-10, 10).Draw(r, name) }
		m0, v0, v1, v2 := c("m"), c("v0"), c("v1"), c("v2")
		length := rapid.Float64Range(0.5, 10).Draw(r, "length")
		shear := func(t float64) float64 { return v0 + t*(v1+t*v2) }
		moment := func(t float64) float64 { return m0 + t*(v0+t*(v1/2+t*v2/3)) }
		p := newShearStretch(length, m0, v0, moment(length), shear(length))
		parts, n := p.parts()
		require.Zero(r, parts[0].from)
		require.Equal(r, length, parts[n-1].to)
		for i, part := range parts[:n] {
			if i > 0 {
				require.Equal(r, parts[i-1].to, part.from)
			}
			for k := range 21 {
				x := part.from + (part.to-part.from)*float64(k)/20
				require.InDelta(r, shear(x), p.shear(x), 1e-9*(1+p.scale))
				require.InDelta(r, moment(x), p.moment(x), 1e-9*(1+p.scale))
				require.GreaterOrEqual(r, float64(part.sign)*moment(x), -1e-6*(1+p.scale))
			}
		}
	})
}

// Where the shear vanishes, found from quadratics with known roots. Roots at the
// ends or beyond are not inside.
func TestTurnsOfTheMoment(t *testing.T) {
	for _, c := range []struct {
		name string
		v    [3]float64 // V = v0 + v1 t + v2 t2 over a length of 4
		want []float64
	}{
		{"(t - 1)(t - 3)", [3]float64{3, -4, 1}, []float64{1, 3}},
		{"(1 - t)(t - 3)", [3]float64{-3, 4, -1}, []float64{1, 3}},
		{"(t - 1)(t - 1.5)", [3]float64{1.5, -2.5, 1}, []float64{1, 1.5}},
		{"(t - 1)(t - 2)/2", [3]float64{1, -1.5, 0.5}, []float64{1, 2}},
		{"(t + 1)(t - 3)", [3]float64{-3, -2, 1}, []float64{3}},
		{"(t - 1)(t + 3)", [3]float64{-3, 2, 1}, []float64{1}},
		{"2 - t", [3]float64{2, -1, 0}, []float64{2}},
		{"t: at the start", [3]float64{0, 1, 0}, nil},
		{"t - 4: at the end", [3]float64{-4, 1, 0}, nil},
		{"t2 + 1: nowhere", [3]float64{1, 0, 1}, nil},
		{"1: nowhere", [3]float64{1, 0, 0}, nil},
		{"0: everywhere", [3]float64{0, 0, 0}, nil},
	} {
		t.Run(c.name, func(t *testing.T) {
			p := shearStretch{length: 4, v: c.v}
			got, n := p.turns()
			require.Len(t, c.want, n)
			for i, want := range c.want {
				require.InDelta(t, want, got[i], 1e-15)
			}
		})
	}
}

// The shear is extreme inside a stretch, not at its ends.
func TestVertexOfTheShear(t *testing.T) {
	p := shearStretch{length: 4, v: [3]float64{3, -4, 1}}
	for _, c := range []struct {
		a, b float64
		ok   bool
	}{{0, 4, true}, {1.9, 2.1, true}, {2, 4, false}, {0, 2, false}, {3, 4, false}} {
		x, ok := p.vertex(c.a, c.b)
		require.Equal(t, c.ok, ok, c)
		require.InDelta(t, 2, x, 1e-15)
	}
	line := shearStretch{length: 4, v: [3]float64{3, -4, 0}}
	x, ok := line.vertex(0, 4)
	require.False(t, ok)
	require.Zero(t, x)
}

// A moment is compared with the greatest moment of the ends, or shear times
// length, whichever is greater: 1e-9 of it has no sign.
func TestSignOfAMoment(t *testing.T) {
	for _, c := range []struct{ m0, v0, m1, v1, scale float64 }{
		{10, 0, 20, 0, 20},
		{-30, 0, 20, 0, 30},
		{1, -8, 2, 3, 32},
		{1, 3, 2, -8, 32},
	} {
		p := newShearStretch(4, c.m0, c.v0, c.m1, c.v1)
		require.Equal(t, c.scale, p.scale, c)
	}
	for _, c := range []struct {
		m    float64
		want int
	}{{1e-8, 0}, {1.01e-6, 1}, {1e-4, 1}, {0.99e-6, 0}, {-1e-8, 0}, {-1.01e-6, -1}, {-1e-4, -1}, {-0.99e-6, 0}} {
		p := shearStretch{length: 4, m: c.m, scale: 1000}
		require.Equal(t, c.want, p.bends(2), c.m)
	}
}

// The places of contraflexure do not depend on how large the moments are.
func TestContraflexureOfSmallMoments(t *testing.T) {
	const w, l = 3e-3, 8.0
	p := newShearStretch(l, -w*l*l/12, w*l/2, -w*l*l/12, -w*l/2)
	parts, n := p.parts()
	require.Equal(t, 3, n)
	require.InDelta(t, l*(0.5-1/math.Sqrt(12)), parts[0].to, 1e-9)
	require.InDelta(t, l*(0.5+1/math.Sqrt(12)), parts[1].to, 1e-9)
}

// At its end a stretch has the shear given, to the last bit.
func TestShearAtTheEndIsAsGiven(t *testing.T) {
	rapid.Check(t, func(r *rapid.T) {
		c := func(name string) float64 { return rapid.Float64Range(-10, 10).Draw(r, name) }
		length, v1 := rapid.Float64Range(0.5, 10).Draw(r, "length"), c("v1")
		p := newShearStretch(length, c("m0"), c("v0"), c("m1"), v1)
		require.Equal(r, v1, p.shear(length))
	})
}

// Shear is linear where its bend over the length is what rounding leaves of the
// shears at the ends: a billionth of their sum.
func TestCurvedShear(t *testing.T) {
	for _, c := range []struct {
		share float64
		want  bool
	}{{0, false}, {0.5, false}, {0.99, false}, {1.01, true}, {-1.01, true}, {1e6, true}} {
		p := shearStretch{length: 4, v: [3]float64{3, 0, c.share * 1e-9 * 8 / 16}, end: -5}
		require.Equal(t, c.want, p.curved(), c.share)
	}
	require.False(t, (&shearStretch{length: 4}).curved(), "no shear at all")
}
