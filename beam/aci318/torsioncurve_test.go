package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"
)

// curvedStretch is 4 m of shear with torque, in SI units.
func curvedStretch(r *rapid.T) (s shearStretch, torque torqueEnds, f float64) {
	draw := func(name string, least, most float64) float64 { return rapid.Float64Range(least, most).Draw(r, name) }
	s = shearStretch{length: 4, v: [3]float64{draw("v0", -9, 9), draw("v1", -9, 9), draw("v2", 0.5, 3)}}
	if rapid.Bool().Draw(r, "falling") {
		s.v[2] = -s.v[2]
	}
	return s, torqueEnds{draw("T0", -9, 9), draw("T1", -9, 9)}, draw("f", 0.2, 2)
}

// Sums and root sums of squares of shear and torque are nowhere greater than at
// the ends of a part and at the places that are met.
func TestShearWithTorqueIsExtremeWhereItIsMet(t *testing.T) {
	rapid.Check(t, func(r *rapid.T) {
		s, torque, f := curvedStretch(r)
		p := signedPart{from: rapid.Float64Range(0, 2).Draw(r, "from"), to: rapid.Float64Range(2, 4).Draw(r, "to")}
		straight := func(x float64) float64 { return f * (torque.from + (torque.to-torque.from)*x/s.length) }
		for name, c := range map[string]struct {
			of   func(x float64) float64
			meet func(visit func(t float64))
		}{
			"V + fT": {func(x float64) float64 { return s.shear(x) + straight(x) }, func(v func(t float64)) { s.meetSums(f, torque, p, v) }},
			"V - fT": {func(x float64) float64 { return s.shear(x) - straight(x) }, func(v func(t float64)) { s.meetSums(f, torque, p, v) }},
			"root":   {func(x float64) float64 { return math.Hypot(s.shear(x), straight(x)) }, func(v func(t float64)) { s.meetRoots(f, torque, p, v) }},
		} {
			if p.to >= s.length { // whose shear is given, not computed
				p.to = s.length - 1e-6
			}
			most, least := max(c.of(p.from), c.of(p.to)), min(c.of(p.from), c.of(p.to))
			c.meet(func(x float64) {
				if !(p.from <= x && x <= p.to) {
					t.Fatalf("%s: %v is met outside %v", name, x, p)
				}
				most, least = max(most, c.of(x)), min(least, c.of(x))
			})
			for k := range 401 {
				x := p.from + (p.to-p.from)*float64(k)/400
				if v := c.of(x); v > most+1e-9 || v < least-1e-9 && name != "root" {
					t.Fatalf("%s at %v: %v, of %v to %v met", name, x, v, least, most)
				}
			}
		}
	})
}

// By hand: V = 4 - t², T = 2t over 4 m. V + T is stationary at 1, V - T at -1,
// which is outside; V² + T² = t⁴ - 4t² + 16 has its least at √2.
func TestPlacesWhereShearWithTorqueIsStationary(t *testing.T) {
	s := shearStretch{length: 4, v: [3]float64{4, 0, -1}}
	var met []float64
	meet := func(t float64) { met = append(met, t) }
	whole := signedPart{from: 0, to: 4}
	s.meetSums(1, torqueEnds{0, 8}, whole, meet)
	require.Equal(t, []float64{1}, met)
	met = nil
	s.meetSums(0.5, torqueEnds{0, -8}, whole, meet)
	require.Equal(t, []float64{0.5}, met)
	met = nil
	s.meetSums(1, torqueEnds{0, 8}, signedPart{from: 1, to: 4}, meet)
	require.Empty(t, met, "an end is met anyway")
	met = nil
	s.meetRoots(1, torqueEnds{0, 8}, signedPart{from: 0.5, to: 4}, meet)
	require.Len(t, met, 1)
	require.InEpsilon(t, math.Sqrt2, met[0], 1e-12)
	// V = t² - 4t + 3 and T = 0: V² turns at 1, 2 and 3.
	met = nil
	s = shearStretch{length: 4, v: [3]float64{3, -4, 1}}
	s.meetRoots(1, torqueEnds{}, signedPart{from: 0.1, to: 3.9}, meet)
	require.InDeltaSlice(t, []float64{1, 2, 3}, met, 1e-12)
	// V = t² + 1 with T = 2 - 4t: 4t³ + 36t - 16 = 0 over 2, one root only.
	met = nil
	s = shearStretch{length: 4, v: [3]float64{1, 0, 1}}
	s.meetRoots(2, torqueEnds{1, -7}, whole, meet)
	require.Len(t, met, 1)
	require.InDelta(t, 0, 4*math.Pow(met[0], 3)+36*met[0]-16, 1e-9)
}
