package statics_test

import (
	"errors"
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/statics"
	"soffit.example/units"
)

// FuzzAnalyze asks for everything about whatever beam the numbers make: each
// outcome is a typed error or finite forces in equilibrium.
func FuzzAnalyze(f *testing.F) {
	f.Add(uint8(1), uint8(2), 8.0, uint8(0), 10.0, 0.0, 0.0, 0.0, uint8(2), 0.0, 0.0, 3.0, 50.0, 1.6)
	f.Add(uint8(3), uint8(3), 8.0, uint8(1), 10.0, 20.0, 2.0, 5.0, uint8(3), 0.0, 0.0, 8.0, 50.0, -1.0)
	f.Add(uint8(3), uint8(4), 0.001, uint8(1), 1e9, -1e9, 0.0, 0.001, uint8(1), 1e-300, 0.0, 1e-5, 2e-5, 1e6)
	f.Add(uint8(4), uint8(1), math.NaN(), uint8(9), math.Inf(1), 0.0, -1.0, 9.0, uint8(0), math.NaN(), 0.0, 0.0, 0.0, math.Inf(-1))
	f.Add(uint8(1), uint8(3), 1e5, uint8(1), 1e9, 0.0, 0.0, 1e-3, uint8(2), 0.0, 0.0, 1e5, 1e9, 1e-300)
	f.Fuzz(func(t *testing.T, left, right uint8, length float64,
		shape1 uint8, a1, b1, c1, d1 float64, shape2 uint8, a2, b2, c2, d2 float64, factor float64) {
		shape := func(kind uint8, a, b, c, d float64) statics.Shape {
			switch kind % 5 {
			case 0:
				return uniform(a)
			case 1:
				return strip(c, d, a, b)
			case 2:
				return point(c, d)
			case 3:
				return couple(c, d)
			}
			return nil
		}
		beam := oneSpan(statics.SupportKind(left%6), length, statics.SupportKind(right%6))
		r, err := statics.Analyze(beam, []statics.Load{
			{Case: "a", Shape: shape(shape1, a1, b1, c1, d1)},
			{Case: "b", Span: 1, Shape: shape(shape2, a2, b2, c2, d2)},
		})
		if err != nil {
			requireTyped(t, err)
			return
		}
		c, err := r.Combine([]statics.Combination{
			{ID: "a", Factors: []statics.Factor{{Case: "a", Value: 1}}},
			{ID: "sum", Factors: []statics.Factor{{Case: "a", Value: factor}, {Case: "b", Value: 1}}},
		})
		if err != nil {
			requireTyped(t, err)
			return
		}
		lines, err := c.Lines(1)
		require.NoError(t, err)
		e, err := lines.Extremes(m(0), m(length))
		require.NoError(t, err)
		for _, f := range []statics.Forces{e.MomentMost, e.MomentLeast, e.ShearMost, e.ShearLeast} {
			require.True(t, f.At.IsFinite() && f.Moment.IsFinite() && f.Shear.IsFinite())
			require.True(t, f.At.AtMost(m(length)) && !f.At.Less(m(0)))
		}
		require.False(t, e.MomentMost.Moment.Less(e.MomentLeast.Moment))
		require.False(t, e.ShearMost.Shear.Less(e.ShearLeast.Shear))
		var roots []units.Length
		for _, line := range lines.All() {
			roots = line.AppendInflections(roots[:0])
			roots = line.AppendZeroShears(roots)
			for _, x := range roots {
				require.False(t, x.Less(m(0)) || m(length).Less(x), "a root off the span")
			}
			for p := range line.Pieces() {
				require.True(t, p.Shear.IsFinite() && p.Moment.IsFinite() && p.ShearEnd.IsFinite() && p.MomentEnd.IsFinite())
			}
		}
		for support := 1; support <= 2; support++ {
			x, err := c.ReactionExtremes(support)
			require.NoError(t, err)
			require.True(t, x.ForceMost.Force.IsFinite() && x.MomentLeast.Moment.IsFinite())
		}
	})
}

// requireTyped holds an error to the types that the package documents.
func requireTyped(t *testing.T, err error) {
	t.Helper()
	var (
		outside   *statics.RangeError
		field     *statics.FieldError
		mechanism *statics.MechanismError
	)
	require.True(t, errors.As(err, &outside) || errors.As(err, &field) || errors.As(err, &mechanism), "%T: %v", err, err)
	require.NotEmpty(t, err.Error())
}
