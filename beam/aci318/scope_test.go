package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// 9.9.1.1 and 9.5.2 of 318M: the limits of the inch-pound edition. The section
// is 400 by 600 mm of 25 MPa, on supports of 300 mm.
func TestScopeInMetric(t *testing.T) {
	mm := units.Millimetre.Of
	brief := func() beam.Brief {
		b := usBrief()
		b.Reinforcement.Catalog = "astm-metric"
		b.Section.Width, b.Section.Depth = mm(400), mm(600)
		b.Concrete.Strength, b.Reinforcement.Yield = units.Megapascal.Of(25), units.Megapascal.Of(420)
		b.Spans[0] = mm(8000)
		b.Supports[0].Width, b.Supports[1].Width = mm(300), mm(300)
		b.Loads = []beam.Load{{Case: beam.Dead, Shape: beam.Uniform, Intensity: units.KilonewtonPerMetre.Of(10)}}
		return b
	}
	point := func(at float64) func(*beam.Brief) {
		return func(b *beam.Brief) {
			b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kilonewton.Of(50), At: mm(at)})
		}
	}
	axial := func(kn float64) func(*beam.Brief) {
		return func(b *beam.Brief) {
			b.Spans, b.Supports, b.Loads = nil, nil, nil
			b.Demands = []beam.Demand{{Name: "A", Moment: units.KilonewtonMetre.Of(50), Axial: units.Kilonewton.Of(kn)}}
		}
	}
	for _, c := range []struct {
		name string
		edit func(*beam.Brief)
		rule string
	}{
		{"clear span of 4h", func(b *beam.Brief) { b.Spans[0] = mm(2700) }, "scope.deep-beam"},
		{"clear span above 4h", func(b *beam.Brief) { b.Spans[0] = mm(2701) }, ""},
		{"load at 2h from the face", point(1350), "scope.load-within-2h"},
		{"load beyond 2h", point(1351), ""},
		{"compression of 0.10 f'c Ag", axial(600), "scope.axial"},
		{"compression below it", axial(599.9), ""},
	} {
		for _, code := range []Code{ACI31814M(), ACI31819M()} {
			b := brief()
			c.edit(&b)
			p := &beam.Problem{Brief: b, Code: code}
			if len(b.Demands) > 0 {
				got := code.e.axialRefusals(b.Section.Width.MulLength(b.Section.Depth), &b.Concrete, b.Demands[0].Axial, "A")
				require.Equal(t, c.rule != "", len(got) == 1, c.name)
				continue
			}
			got := code.e.deepRefusals(p, 1)
			if c.rule == "" {
				require.Empty(t, got, c.name)
				continue
			}
			require.Len(t, got, 1, c.name)
			require.Equal(t, c.rule, got[0].Rule)
		}
	}
}

// A load that stands over a support, up to its face, presses on the support and
// not on the span (9.9.1.1(b)). Supports are 12 in. wide, the span is 264 in.
func TestLoadOverASupport(t *testing.T) {
	for _, c := range []struct {
		at      float64
		refused bool
	}{{0, false}, {6, false}, {6.01, true}, {257.99, true}, {258, false}, {263, false}} {
		b := usBrief()
		b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(10), At: units.Inch.Of(c.at)})
		got := us19.deepRefusals(&beam.Problem{Brief: b}, 1)
		require.Equal(t, c.refused, len(got) == 1, "%g in", c.at)
	}
	b := usBrief()
	b.Supports[1].Kind = statics.Free
	b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(10), At: units.Inch.Of(240)})
	require.Empty(t, us19.deepRefusals(&beam.Problem{Brief: b}, 1), "a free end presses on nothing")
}

// Of several torques that counts which comes nearest its own threshold: axial
// compression raises it (22.7.4.1).
func TestWorstTorque(t *testing.T) {
	// 14 by 24 in. of 4000 psi: φTth = 0.75 √4000 336²/76 lb-in., times
	// √(1 + Nu/(4 Ag √f'c)) under compression (Table 22.7.4.1(a)).
	threshold := 0.75 * math.Sqrt(4000) * 336 * 336 / 76
	free := beam.Demand{Name: "free", Torque: units.PoundInch.Of(0.9 * threshold)}
	pressed := beam.Demand{Name: "pressed", Torque: units.PoundInch.Of(-0.95 * threshold), Axial: units.Kip.Of(30)}
	light := beam.Demand{Name: "light", Torque: units.PoundInch.Of(0.5 * threshold)}
	require.Less(t, 0.95/math.Sqrt(1+30000/(4*336*math.Sqrt(4000))), 0.9)
	for _, order := range [][]beam.Demand{{free, pressed, light}, {light, pressed, free}, {pressed, free, light}} {
		p := problemOf(t, ACI31819(), demandBrief(order...))
		worst, strength, ok := us19.worstTorque(p)
		require.True(t, ok)
		require.Equal(t, "free", worst.Combination)
		require.InEpsilon(t, threshold, strength.phi*strength.threshold, 1e-12)
	}
	again := free
	again.Name = "again"
	worst, _, _ := us19.worstTorque(problemOf(t, ACI31819(), demandBrief(free, again)))
	require.Equal(t, "free", worst.Combination, "of equals the first")

	_, _, ok := us19.worstTorque(problemOf(t, ACI31819(), demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(1)})))
	require.False(t, ok)
}
