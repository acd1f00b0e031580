package beam

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/statics"
	"soffit.example/units"
)

// twisted is a span of 6 m under one dead torque, factored by 1.4.
func twisted(t *testing.T, left, right statics.SupportKind, l Load) Forces {
	t.Helper()
	l.Case = Dead
	b := Brief{
		Spans:    []units.Length{units.Metre.Of(6)},
		Supports: []Support{{Kind: left}, {Kind: right}},
		Loads:    []Load{l},
	}
	kept := []Combination{{ID: "1.4D", Factors: []CaseFactor{{Case: Dead, Factor: 1.4}}}}
	f, err := memberForces(&b, units.LineLoad{}, kept)
	require.NoError(t, err)
	return f
}

// Closed forms for a prismatic shaft: a torque T at a from the left of a span
// held at both ends goes to the left in the share (L-a)/L, to the right in the
// share a/L (Roark's Formulas for Stress and Strain, torsion of bars, from
// memory).
func TestTorqueAlongASpan(t *testing.T) {
	point := Load{Shape: Torque, At: units.Metre.Of(2), Moment: units.KilonewtonMetre.Of(30)}
	spread := Load{Shape: UniformTorque, Moment: units.KilonewtonMetre.Of(30)}
	tests := []struct {
		name        string
		left, right statics.SupportKind
		load        Load
		at          float64
		after       bool
		want        float64 // kN-m
	}{
		{"point, left of it", statics.Pinned, statics.Roller, point, 1, true, 1.4 * 30 * 4 / 6},
		{"point, just left", statics.Pinned, statics.Roller, point, 2, false, 1.4 * 30 * 4 / 6},
		{"point, just right", statics.Pinned, statics.Roller, point, 2, true, -1.4 * 30 * 2 / 6},
		{"point, right of it", statics.Pinned, statics.Roller, point, 5, true, -1.4 * 30 * 2 / 6},
		{"point on a cantilever", statics.Fixed, statics.Free, point, 1, true, 1.4 * 30},
		{"beyond a point on a cantilever", statics.Fixed, statics.Free, point, 3, true, 0},
		{"point, held right only", statics.Free, statics.Fixed, point, 3, true, -1.4 * 30},
		{"spread, left end", statics.Pinned, statics.Roller, spread, 0, true, 1.4 * 15},
		{"spread, middle", statics.Pinned, statics.Roller, spread, 3, true, 0},
		{"spread, right end", statics.Pinned, statics.Roller, spread, 6, false, -1.4 * 15},
		{"spread on a cantilever", statics.Fixed, statics.Free, spread, 0, true, 1.4 * 30},
		{"spread on a cantilever, middle", statics.Fixed, statics.Free, spread, 3, true, 1.4 * 15},
	}
	for _, tt := range tests {
		t.Run(tt.name, func(t *testing.T) {
			f := twisted(t, tt.left, tt.right, tt.load)
			a := f.Action(0, 1, units.Metre.Of(tt.at), tt.after)
			require.InDelta(t, tt.want, a.Torque.In(units.KilonewtonMetre), 1e-9)
		})
	}
}

func TestGreatestTorque(t *testing.T) {
	f := twisted(t, statics.Pinned, statics.Roller, Load{Shape: Torque, At: units.Metre.Of(2), Moment: units.KilonewtonMetre.Of(30)})
	a, ok := f.Torque(1, units.Length{}, units.Metre.Of(6))
	require.True(t, ok)
	require.InDelta(t, 28, a.Torque.Abs().In(units.KilonewtonMetre), 1e-9)
	require.Equal(t, "1.4D", a.Combination)
}

// The extremes between the support faces are kept, and asking for them again
// or for others gives the same as the analysis does.
func TestMomentAndShearOfASimpleSpan(t *testing.T) {
	b := Brief{
		Spans:    []units.Length{units.Metre.Of(8)},
		Supports: []Support{{Kind: statics.Pinned, Width: units.Metre.Of(0.4)}, {Kind: statics.Roller, Width: units.Metre.Of(0.4)}},
		Loads:    []Load{{Case: Dead, Shape: Uniform, Intensity: units.KilonewtonPerMetre.Of(10)}},
	}
	kept := []Combination{{ID: "1.4D", Factors: []CaseFactor{{Case: Dead, Factor: 1.4}}}, {ID: "0.9D", Factors: []CaseFactor{{Case: Dead, Factor: 0.9}}}}
	f, err := memberForces(&b, units.LineLoad{}, kept)
	require.NoError(t, err)
	face, end := units.Metre.Of(0.2), units.Metre.Of(7.8)
	a, ok := f.Moment(Positive, 1, face, end)
	require.True(t, ok)
	require.InEpsilon(t, 14*64/8.0, a.Moment.In(units.KilonewtonMetre), 1e-12) // w L2/8
	require.InEpsilon(t, 4.0, a.At.In(units.Metre), 1e-12)
	require.Equal(t, "1.4D", a.Combination)
	_, ok = f.Moment(Negative, 1, face, end)
	require.False(t, ok)
	v, ok := f.Shear(1, face, end)
	require.True(t, ok)
	require.InEpsilon(t, 14*(4-0.2), v.Shear.Abs().In(units.Kilonewton), 1e-12)
	v, ok = f.Shear(1, units.Metre.Of(2), units.Metre.Of(3))
	require.True(t, ok)
	require.InEpsilon(t, 14*2.0, v.Shear.In(units.Kilonewton), 1e-12)
	require.Equal(t, 2, f.Combinations())
	_, ok = f.Torque(1, face, end)
	require.False(t, ok)
}

// The reactions of a propped cantilever under w: 5wL/8 at the fixed end with
// wL2/8, 3wL/8 at the prop (AISC Manual Table 3-23, from memory).
func TestReactions(t *testing.T) {
	b := Brief{
		Spans:    []units.Length{units.Metre.Of(8)},
		Supports: []Support{{Kind: statics.Fixed}, {Kind: statics.Roller}},
		Loads: []Load{
			{Case: Dead, Shape: Uniform, Intensity: units.KilonewtonPerMetre.Of(10)},
			{Case: Wind, Shape: Uniform, Intensity: units.KilonewtonPerMetre.Of(-20)},
		},
	}
	kept := []Combination{
		{ID: "1.4D", Factors: []CaseFactor{{Case: Dead, Factor: 1.4}}},
		{ID: "0.9D + 1.0W", Factors: []CaseFactor{{Case: Dead, Factor: 0.9}, {Case: Wind, Factor: 1}}},
	}
	f, err := memberForces(&b, units.LineLoad{}, kept)
	require.NoError(t, err)
	r := f.Reactions()
	require.Len(t, r, 2)
	require.InEpsilon(t, 14*8*5/8.0, r[0].Most.In(units.Kilonewton), 1e-12)
	require.InEpsilon(t, -11*8*5/8.0, r[0].Least.In(units.Kilonewton), 1e-12)
	require.InEpsilon(t, 14*64/8.0, r[0].Moment.In(units.KilonewtonMetre), 1e-12)
	require.InEpsilon(t, 14*8*3/8.0, r[1].Most.In(units.Kilonewton), 1e-12)
	require.Equal(t, "1.4D", r[1].MostBy)
	require.Equal(t, "0.9D + 1.0W", r[1].LeastBy)
	require.True(t, r[1].Moment.IsZero())
}

// The part of a torque that compatibility imposes goes its own way along the
// span: torques of both paths add up to the torque, and only the one counts as
// compatible.
func TestCompatibleTorqueAlongASpan(t *testing.T) {
	b := Brief{
		Spans:    []units.Length{units.Metre.Of(6)},
		Supports: []Support{{Kind: statics.Fixed}, {Kind: statics.Fixed}},
		Loads: []Load{
			{Case: Dead, Shape: Torque, At: units.Metre.Of(2), Moment: units.KilonewtonMetre.Of(30), Path: CompatibilityTorque},
			{Case: Dead, Shape: UniformTorque, Moment: units.KilonewtonMetre.Of(-12), Path: EquilibriumTorque},
			{Case: Dead, Shape: Torque, At: units.Metre.Of(4), Moment: units.KilonewtonMetre.Of(9)},
		},
	}
	kept := []Combination{{ID: "1.4D", Factors: []CaseFactor{{Case: Dead, Factor: 1.4}}}}
	f, err := memberForces(&b, units.LineLoad{}, kept)
	require.NoError(t, err)
	// At 1 m: 30·4/6 of the first, -12·(1/2 - 1/6) of the second, 9·2/6 of the third.
	a := f.Action(0, 1, units.Metre.Of(1), true)
	require.InDelta(t, 1.4*20, a.Compatible.In(units.KilonewtonMetre), 1e-9)
	require.InDelta(t, 1.4*(20-4+3), a.Torque.In(units.KilonewtonMetre), 1e-9)
	worst, ok := f.Torque(1, units.Length{}, units.Metre.Of(6))
	require.True(t, ok)
	require.InDelta(t, 1.4*20, worst.Compatible.In(units.KilonewtonMetre), 1e-9)

	d := demandForces([]Demand{{Torque: units.KilonewtonMetre.Of(5), Path: CompatibilityTorque}, {Torque: units.KilonewtonMetre.Of(7)}})
	require.Equal(t, units.KilonewtonMetre.Of(5), d.Demands()[0].Compatible)
	require.True(t, d.Demands()[1].Compatible.IsZero())
}
