package working_test

import (
	"context"
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
	"soffit.example/beam/internal/expression"
	"soffit.example/beam/statics"
	"soffit.example/beam/working"
	"soffit.example/units"
)

// briefs are beams of our own whose working takes different ways: the system
// of units, bending of both senses, compression steel, stirrups and none,
// torsion, wind.
func briefs(code beam.Code) map[string]beam.Brief {
	base := beam.Brief{
		Section:       beam.Section{Shape: beam.Rectangular, Width: units.Inch.Of(14), Depth: units.Inch.Of(24)},
		Concrete:      beam.Concrete{Strength: units.PSI.Of(4500), Aggregate: units.Inch.Of(0.75)},
		Reinforcement: beam.Reinforcement{Catalog: "astm-inch", Yield: units.KSI.Of(60)},
		Exposure:      beam.Interior,
		Preferences:   beam.Preferences{Bars: []string{"#6", "#8"}, Stirrups: []string{"#3"}, NoCures: true},
		Spans:         []units.Length{units.Foot.Of(22)},
		Supports:      []beam.Support{{Kind: statics.Pinned, Width: units.Inch.Of(12)}, {Kind: statics.Roller, Width: units.Inch.Of(12)}},
		Loads: []beam.Load{
			{Case: beam.Dead, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1.1)},
			{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1.3)},
		},
	}
	if code.Edition().System == units.SI {
		base.Section = beam.Section{Shape: beam.Rectangular, Width: units.Millimetre.Of(350), Depth: units.Millimetre.Of(600)}
		base.Concrete = beam.Concrete{Strength: units.Megapascal.Of(30), Aggregate: units.Millimetre.Of(20)}
		base.Reinforcement = beam.Reinforcement{Catalog: "astm-metric", Yield: units.Megapascal.Of(420)}
		base.Spans = []units.Length{units.Metre.Of(6.6)}
		base.Preferences.Bars, base.Preferences.Stirrups = []string{"No. 19", "No. 25"}, []string{"No. 10"}
	}
	out := map[string]beam.Brief{"simple": base}
	change := func(name string, f func(b *beam.Brief)) {
		b := base
		b.Supports = append([]beam.Support(nil), base.Supports...)
		b.Loads = append([]beam.Load(nil), base.Loads...)
		f(&b)
		out[name] = b
	}
	change("fixed", func(b *beam.Brief) { b.Supports[0].Kind, b.Supports[1].Kind = statics.Fixed, statics.Fixed })
	change("light", func(b *beam.Brief) {
		b.Concrete.Kind, b.Concrete.Density = beam.SandLightweight, units.PoundPerCubicFoot.Of(110)
	})
	change("slender", func(b *beam.Brief) { b.Section.Depth = b.Section.Depth.Scale(0.6) })
	change("detailed shear", func(b *beam.Brief) { b.Readings.ShearMethod = beam.DetailedShear })
	change("rounded yield", func(b *beam.Brief) { b.Readings.RoundedYield = true })
	change("point load", func(b *beam.Brief) {
		b.Loads = append(b.Loads, beam.Load{Case: beam.Wind, Shape: beam.PointLoad, At: units.Metre.Of(3), Force: units.Kilonewton.Of(90)})
	})
	change("demands", func(b *beam.Brief) {
		b.Spans, b.Supports, b.Loads = nil, nil, nil
		b.Demands = []beam.Demand{
			{Name: "most", Moment: units.KilonewtonMetre.Of(350), Shear: units.Kilonewton.Of(180)},
			{Name: "least", Moment: units.KilonewtonMetre.Of(-120), Shear: units.Kilonewton.Of(90)},
		}
	})
	return out
}

// Every computed step of every check follows from its expression and the
// steps before it, in the units that its clause is written in.
func TestEveryStepFollowsFromItsExpression(t *testing.T) {
	computed := 0
	for _, code := range aci318.Editions() {
		for name, brief := range briefs(code) {
			r, err := beam.Design(context.Background(), code, brief)
			require.NoError(t, err, name)
			for i := range r.Checks {
				known := map[string]float64{}
				for _, l := range working.Lines(&r.Checks[i], r.System) {
					where := code.Edition().ID + ", " + name + ", " + r.Checks[i].ID + ": " + l.Symbol + " = " + l.Expression
					value, err := l.Value.Number.Float64()
					require.NoError(t, err, where)
					if l.Expression != "" {
						computed++
						got, err := expression.Evaluate(l.Expression, known)
						require.NoError(t, err, where)
						requireClose(t, value, got, 1e-8, where)
					}
					if l.Substitution != "" {
						// Six digits are put in, so that differences of like
						// numbers lose some.
						_, err := expression.Evaluate(l.Substitution, nil)
						require.NoError(t, err, "%s: %s", where, l.Substitution)
					}
					known[l.Symbol] = value
				}
			}
		}
	}
	require.Greater(t, computed, 500)
}

func requireClose(t *testing.T, want, got, tolerance float64, where string) {
	t.Helper()
	if math.Abs(want-got) > tolerance*max(math.Abs(want), math.Abs(got), 1e-9) {
		require.Fail(t, "the value is not that of its expression", "%s\nvalue %.12g, expression %.12g", where, want, got)
	}
}
