package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

func rectangle(width, depth units.Length) beam.Section {
	return beam.Section{Shape: beam.Rectangular, Width: width, Depth: depth}
}

// Required steel put back into the kernel gives the demand.
func TestRequiredSteelGivesTheDemand(t *testing.T) {
	single, both := 0, 0
	rapid.Check(t, func(t *rapid.T) {
		c := rapid.SampledFrom(Editions()).Draw(t, "code")
		e := c.e
		fc := psi(rapid.Float64Range(2600, 11000).Draw(t, "fc"))
		fy := psi(rapid.Float64Range(41000, 79000).Draw(t, "fy"))
		b, d := rapid.Float64Range(8, 36).Draw(t, "b"), rapid.Float64Range(10, 48).Draw(t, "d")
		extreme := d + rapid.Float64Range(0, 1.2).Draw(t, "dt - d")
		q := SteelQuery{
			Section: rectangle(in(b), in(extreme+2.5)), Depth: in(d), Extreme: in(extreme), Top: in(2.5), Strength: fc, Yield: fy,
			Readings: beam.Readings{IgnoreDisplaced: rapid.Bool().Draw(t, "ignore")},
		}
		// As a share of the moment of a balanced block.
		fcPsi := fc.In(units.PSI)
		q.Moment = units.PoundInch.Of(fcPsi * b * d * d * rapid.Float64Range(0.005, 0.45).Draw(t, "Rn"))
		s, err := c.RequiredSteel(q)
		if err != nil {
			return // compression steel too deep to help
		}
		// Two layers about d, with one at dt, when they differ.
		layers := []mechanics.Layer{{Depth: q.Extreme, Area: s.Tension.Scale(0.5)}, {Depth: q.Depth.Scale(2).Sub(q.Extreme), Area: s.Tension.Scale(0.5)}}
		if s.Compression.IsZero() {
			single++
		} else {
			both++
			layers = append(layers, mechanics.Layer{Depth: q.Top, Area: s.Compression})
		}
		f, err := e.flexureStrength(e.testSection(in(b), in(extreme+2.5), fy, layers...), fc, beam.Positive, &q.Readings)
		if err != nil {
			t.Fatal(err)
		}
		if inner := f.Layers[1].Stress; inner != fy && inner.Sub(fy).Abs().Ratio(fy) > 1e-12 {
			return // the inner layer does not yield: outside the closed form
		}
		if f.Equilibria > 1 {
			return // the least neutral axis is another one than the one put in
		}
		if got, want := f.Design.In(units.KipFoot), q.Moment.In(units.KipFoot); math.Abs(got-want) > 1e-9*want {
			t.Fatalf("%v kip-ft asked for, %v found; %+v", want, got, s)
		}
		if math.Abs(f.ExtremeStrain-s.Strain) > 1e-9 || math.Abs(f.Phi-s.Phi) > 1e-9 {
			t.Fatalf("strain %v and φ %v, found %v and %v", s.Strain, s.Phi, f.ExtremeStrain, f.Phi)
		}
	})
	require.Positive(t, single)
	require.Positive(t, both)
}

// In the transition of 318-14 φ falls while Mn grows: the required steel is
// still the least that gives the moment. Own-calculation check at a strain of
// 0.0045: c = 22 × 3/7.5 = 8.8 in, a = 7.48 in, As = 0.85 × 4 × 14 × 7.48/60
// = 5.9341 in2, Mn = 5.9341 × 60 × (22 - 3.74) = 6501.4 kip-in,
// φ = 0.65 + 0.25 (0.0045 - 0.0020690)/(0.005 - 0.0020690) = 0.857353.
func TestRequiredSteelInTheTransition(t *testing.T) {
	as := 0.85 * 4 * 14 * 7.48 / 60
	phi := 0.65 + 0.25*(0.0045-60.0/29000)/(0.005-60.0/29000)
	mu := phi * as * 60 * (22 - 3.74)
	q := SteelQuery{Section: rectangle(in(14), in(24.5)), Depth: in(22), Strength: psi(4000), Yield: psi(60000), Moment: units.KipInch.Of(mu)}
	s, err := ACI31814().RequiredSteel(q)
	require.NoError(t, err)
	require.InEpsilon(t, as, s.Tension.In(units.SquareInch), 1e-9)
	require.InEpsilon(t, 0.0045, s.Strain, 1e-9)
	require.InDelta(t, 0.857353, s.Phi, 5e-7)

	_, err = ACI31819().RequiredSteel(q)
	require.ErrorContains(t, err, "no tension steel alone")
	q.Top = in(2.5)
	s, err = ACI31819().RequiredSteel(q)
	require.NoError(t, err)
	require.Positive(t, s.Compression.In(units.SquareInch))
	require.Equal(t, 0.9, s.Phi)
}

func TestRequiredSteelInput(t *testing.T) {
	good := SteelQuery{Section: rectangle(in(14), in(24.5)), Depth: in(22), Strength: psi(4000), Yield: psi(60000), Moment: units.KipFoot.Of(200)}
	for _, tc := range []struct {
		name string
		edit func(q *SteelQuery)
		want string
	}{
		{"no width", func(q *SteelQuery) { q.Section.Width = units.Length{} }, "/section/width"},
		{"no depth", func(q *SteelQuery) { q.Depth = units.Length{} }, "depth of the tension steel is 0 in; allowed: above zero"},
		{"extreme below the section", func(q *SteelQuery) { q.Extreme = in(25) }, "no more than that of the section, 24.5 in"},
		{"layers too far apart", func(q *SteelQuery) { q.Depth, q.Extreme, q.Moment = in(13), in(24), units.KipFoot.Of(230) }, "too far apart"},
		{"sense", func(q *SteelQuery) { q.Bending = 3 }, "sense of bending"},
		{"NaN", func(q *SteelQuery) { q.Moment = units.KipFoot.Of(math.NaN()) }, "moment"},
		{"negative moment", func(q *SteelQuery) { q.Moment = units.KipFoot.Of(-1) }, "moment is -1 kip-ft"},
		{"extreme above centroid", func(q *SteelQuery) { q.Extreme = in(20) }, "extreme layer is 20 in"},
		{"compression steel too low", func(q *SteelQuery) { q.Top = in(23) }, "compression steel is 23 in"},
		{"grade", func(q *SteelQuery) { q.Yield = psi(120000) }, "Table 20.2.2.4(a)"},
		{"strength", func(q *SteelQuery) { q.Strength = psi(2000) }, "19.2.1.1"},
		{"compression steel of no help", func(q *SteelQuery) { q.Moment, q.Top = units.KipFoot.Of(900), in(12) }, "does not help"},
	} {
		t.Run(tc.name, func(t *testing.T) {
			q := good
			tc.edit(&q)
			_, err := ACI31819().RequiredSteel(q)
			require.ErrorContains(t, err, tc.want)
		})
	}
}

// The bound of LeastTension, against a scan over every place of the centroid:
// no area below it passes both strength and least steel.
func TestLeastAreaIsALowerBound(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		e := rapid.SampledFrom(Editions()).Draw(t, "code").e
		fc, fy := psi(rapid.Float64Range(2600, 9000).Draw(t, "fc")), psi(rapid.Float64Range(41000, 79000).Draw(t, "fy"))
		width, depth := in(rapid.Float64Range(8, 30).Draw(t, "b")), in(rapid.Float64Range(10, 40).Draw(t, "d"))
		r := e.sizing(mechanics.Rectangle(width, depth.Scale(1.1)), beam.Positive, fc, fy, depth, depth, false)
		mu := e.momentIn(fc.MulArea(width.MulLength(depth)).MulLength(depth)) * rapid.Float64Range(0.0005, 0.2).Draw(t, "Rn")
		if !r.mayCarry(mu) {
			return
		}
		perDepth := e.minimumSteel(fc, fy, e.minimumWidth(width, width, true), depth).area / r.depth
		bound := r.leastArea(mu, perDepth, e.minimum.waiver)
		least := math.Inf(1)
		for i := 1; i <= 400; i++ {
			at := r
			at.depth = r.depth * float64(i) / 400
			req := at.tension(mu)
			if !req.ok {
				continue
			}
			need := math.Max(req.area, math.Min(perDepth*at.depth, e.minimum.waiver*req.area))
			least = math.Min(least, need)
		}
		if least < bound*(1-1e-9) {
			t.Fatalf("bound %v, but %v would do", bound, least)
		}
		if !math.IsInf(least, 1) && bound < least*0.9 && r.tension(mu).phi == 0.9 {
			t.Fatalf("bound %v is far below the least of %v", bound, least)
		}
	})
}
