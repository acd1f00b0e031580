package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/beam"
	"soffit.example/beam/mechanics"
)

// The steel that a moment needs in a tee, by the closed form in the flange and
// below it. Own calculation, f'c = 4000 psi, fy = 60 ksi, bf = 48 in, hf = 4 in,
// bw = 12 in, d = 20 in:
//
//	a = 3 in in the flange: As = 0.85 × 4 × 48 × 3/60 = 8.16 in2,
//	  Mn = 489.6 × (20 - 1.5) = 9057.6 kip-in
//	a = 6 in, 2 in of it in the web: Cf = 0.85 × 4 × 48 × 4 = 652.8 kip at 2 in,
//	  Cw = 0.85 × 4 × 12 × 2 = 81.6 kip at 5 in, As = 734.4/60 = 12.24 in2,
//	  Mn = 652.8 × 18 + 81.6 × 15 = 12974.4 kip-in
//	hogging, the web in compression, a = 5 in: As = 0.85 × 4 × 12 × 5/60 = 3.4 in2,
//	  Mn = 204 × (20 - 2.5) = 3570 kip-in
//
// c/d is at most 6/0.85/20 = 0.353, so that φ = 0.9 in either edition.
func TestSteelOfATee(t *testing.T) {
	parts := mechanics.Tee(in(48), in(4), in(12), in(22))
	for _, tc := range []struct {
		name  string
		sense beam.Sense
		mn    float64 // kip-in
		as, a float64
	}{
		{"block in the flange", beam.Positive, 9057.6, 8.16, 3},
		{"block just fills the flange", beam.Positive, 652.8 * 18, 652.8 / 60, 4},
		{"block below the flange", beam.Positive, 12974.4, 12.24, 6},
		{"web in compression", beam.Negative, 3570, 3.4, 5},
	} {
		t.Run(tc.name, func(t *testing.T) {
			for _, c := range []Code{ACI31814(), ACI31819()} {
				z := c.e.sizing(parts, tc.sense, psi(4000), psi(60000), in(20), in(20), false)
				r := z.tension(0.9 * tc.mn * 1000)
				require.True(t, r.ok)
				require.InEpsilon(t, tc.as, r.area, 1e-12)
				require.InEpsilon(t, tc.a, r.block, 1e-12)
				require.Equal(t, 0.9, r.phi)
			}
		})
	}
}

// In a trapezoid that widens downward from 10 to 20 in over 25 in, with the
// tension steel at 20 in: a = 5 in has the area 5 × (10 + 12)/2 = 55 in2, its
// first moment about the face 10 × 25/2 + 0.4 × 125/3 = 141.667 in3, hence
// Mn = 0.85 × 4 × (55 × 20 - 141.667) = 3258.333 kip-in, As = 187/60 in2. Own
// calculation.
func TestSteelOfATrapezoid(t *testing.T) {
	parts := []mechanics.Part{{Bottom: in(25), Width: in(10), BottomWidth: in(20)}}
	z := ACI31819().e.sizing(parts, beam.Positive, psi(4000), psi(60000), in(20), in(20), false)
	r := z.tension(0.9 * 3.4 * (55*20 - 425.0/3) * 1000)
	require.True(t, r.ok)
	require.InEpsilon(t, 5.0, r.block, 1e-12)
	require.InEpsilon(t, 187.0/60, r.area, 1e-12)

	// Turned upside down with the opposite moment it is the same.
	parts = []mechanics.Part{{Bottom: in(25), Width: in(20), BottomWidth: in(10)}}
	z = ACI31819().e.sizing(parts, beam.Negative, psi(4000), psi(60000), in(20), in(20), false)
	require.InEpsilon(t, 187.0/60, z.tension(0.9*3.4*(55*20-425.0/3)*1000).area, 1e-12)
}

// drawParts is a stack of one to four rectangles and trapezoids.
func drawParts(t *rapid.T, tapers bool) []mechanics.Part {
	n := rapid.IntRange(1, 4).Draw(t, "parts")
	parts := make([]mechanics.Part, n)
	at := 0.0
	for i := range parts {
		parts[i] = mechanics.Part{Top: in(at), Width: in(rapid.Float64Range(6, 60).Draw(t, "width"))}
		at += rapid.Float64Range(2, 14).Draw(t, "height")
		parts[i].Bottom = in(at)
		if tapers && rapid.Bool().Draw(t, "taper") {
			parts[i].BottomWidth = in(rapid.Float64Range(6, 60).Draw(t, "bottom"))
		}
	}
	return parts
}

// Required steel of any stack in either sense, put back into the kernel, gives
// the moment; and where none is found, no neutral axis up to the strain limit
// gives as much.
func TestSteelOfAnyStackGivesTheMoment(t *testing.T) {
	found := 0
	rapid.Check(t, func(t *rapid.T) {
		e := rapid.SampledFrom(Editions()).Draw(t, "code").e
		sense := rapid.SampledFrom([]beam.Sense{beam.Positive, beam.Negative}).Draw(t, "sense")
		parts := drawParts(t, false)
		h := parts[len(parts)-1].Bottom
		d := h.Scale(rapid.Float64Range(0.7, 0.95).Draw(t, "d"))
		fc, fy := psi(rapid.Float64Range(2600, 11000).Draw(t, "fc")), psi(rapid.Float64Range(41000, 79000).Draw(t, "fy"))
		z := e.sizing(parts, sense, fc, fy, d, d, false)
		limit := z.axisAt(z.reduction.leastStrain(z.yieldStrain))
		mu := z.nominal(limit) * rapid.Float64Range(0.01, 1).Draw(t, "share")
		r := z.tension(mu)
		if !r.ok {
			for i := range 100 {
				if m := z.design(limit * float64(i+1) / 100); mu <= m {
					t.Fatalf("nothing found for %v, and %v is reached", mu, m)
				}
			}
			return
		}
		found++
		layer := mechanics.Layer{Depth: d, Area: e.areaOf(r.area)}
		if sense == beam.Negative {
			layer.Depth = h.Sub(d)
		}
		layer.Steel = e.barSteel(fy)
		f, err := e.flexureStrength(mechanics.Section{Parts: parts, Layers: []mechanics.Layer{layer}}, fc, sense, &beam.Readings{})
		if err != nil {
			t.Fatal(err)
		}
		if got := e.momentIn(f.Design); math.Abs(got-mu) > 1e-9*mu {
			t.Fatalf("%v asked for, %v found; %+v", mu, got, r)
		}
	})
	require.Positive(t, found)
}

// Strips of tapering sides: the axis found gives the moment back.
func TestAxisOfTaperedStrips(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		parts := drawParts(t, true)
		d := parts[len(parts)-1].Bottom.Scale(rapid.Float64Range(0.5, 0.95).Draw(t, "d"))
		sense := rapid.SampledFrom([]beam.Sense{beam.Positive, beam.Negative}).Draw(t, "sense")
		z := ACI31819().e.sizing(parts, sense, psi(4000), psi(60000), d, d, false)
		axis := z.depth / z.beta1 * rapid.Float64Range(0.001, 0.99).Draw(t, "axis")
		if got := z.axisFor(z.nominal(axis)); math.Abs(z.nominal(got)-z.nominal(axis)) > 1e-12*z.nominal(axis) {
			t.Fatalf("axis %v put in, %v found", axis, got)
		}
		require.True(t, math.IsNaN(z.axisFor(z.nominal(z.depth/z.beta1)*1.0001)))
	})
}

func BenchmarkRequiredSteelOfATee(b *testing.B) {
	z := ACI31819().e.sizing(mechanics.Tee(in(48), in(4), in(12), in(22)), beam.Positive, psi(4000), psi(60000), in(20), in(20), false)
	b.ReportAllocs()
	var sink float64
	for b.Loop() {
		sink += z.tension(11e6).area
	}
	require.Positive(b, sink)
}
