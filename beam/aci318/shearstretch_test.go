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
