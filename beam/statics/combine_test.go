package statics_test

import (
	"fmt"
	"slices"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/beam/statics"
)

func factors(pairs ...any) []statics.Factor {
	var out []statics.Factor
	for i := 0; i < len(pairs); i += 2 {
		out = append(out, statics.Factor{Case: pairs[i].(string), Value: pairs[i+1].(float64)})
	}
	return out
}

// TestEnvelope works a simple beam by hand: dead 10 kN/m and live 20 kN/m over
// 8 m, wind uplift 16 kN/m.
func TestEnvelope(t *testing.T) {
	r, err := statics.Analyze(oneSpan(statics.Pinned, 8, statics.Roller), []statics.Load{
		{ID: "slab", Case: "dead", Shape: uniform(6)},
		{ID: "self", Case: "dead", Span: 1, Shape: uniform(4)},
		{ID: "people", Case: "live", Shape: uniform(20)},
		{ID: "suction", Case: "wind", Shape: uniform(-16)},
	})
	require.NoError(t, err)
	require.Equal(t, []string{"dead", "live", "wind"}, slices.Collect(r.IDs()))
	c, err := r.Combine([]statics.Combination{
		{ID: "1.4D", Factors: factors("dead", 1.4)},
		{ID: "1.2D + 1.6L", Factors: factors("dead", 1.2, "live", 1.6)},
		{ID: "the same again", Factors: factors("live", 1.6, "dead", 1.2)},
		{ID: "0.9D + 1.0W", Factors: factors("dead", 0.9, "wind", 1.0)},
	})
	require.NoError(t, err)
	lines, err := c.Lines(1)
	require.NoError(t, err)
	require.Equal(t, m(8), lines.Length())
	require.Equal(t, []float64{0, 8}, metres(lines.AppendBreaks(nil)))

	e, err := lines.Extremes(m(0), m(8))
	require.NoError(t, err)
	require.Equal(t, "1.2D + 1.6L", e.MomentMost.ID, "of equals the first")
	require.InDelta(t, 44*8.0*8/8, inKNm(e.MomentMost.Moment), 1e-10)
	require.InDelta(t, 4, inM(e.MomentMost.At), 1e-12)
	require.InDelta(t, 0, inKN(e.MomentMost.Shear), 1e-10)
	require.Equal(t, "0.9D + 1.0W", e.MomentLeast.ID)
	require.InDelta(t, -7*8.0*8/8, inKNm(e.MomentLeast.Moment), 1e-10)
	require.Equal(t, "1.2D + 1.6L", e.ShearMost.ID)
	require.InDelta(t, 44*4, inKN(e.ShearMost.Shear), 1e-10)
	require.Zero(t, inKNm(e.ShearMost.Moment))
	require.Equal(t, m(8), e.ShearLeast.At)

	e, err = lines.Extremes(m(1), m(1))
	require.NoError(t, err)
	require.InDelta(t, 44.0/2*1*7, inKNm(e.MomentMost.Moment), 1e-10)
	require.InDelta(t, 44*3, inKN(e.MomentMost.Shear), 1e-10, "the shear that acts with it")
	require.Equal(t, e.MomentMost, e.ShearMost)

	support, err := c.ReactionExtremes(2)
	require.NoError(t, err)
	require.Equal(t, "1.2D + 1.6L", support.ForceMost.ID)
	require.InDelta(t, 44*4, inKN(support.ForceMost.Force), 1e-10)
	require.Equal(t, "0.9D + 1.0W", support.ForceLeast.ID)
	require.InDelta(t, -7*4, inKN(support.ForceLeast.Force), 1e-10)
	require.Zero(t, support.MomentMost.Moment)

	var ids []string
	for i, line := range lines.All() {
		ids = append(ids, fmt.Sprint(i, line.ID(), line.Length()))
	}
	require.Equal(t, []string{"01.4D8 m", "11.2D + 1.6L8 m", "2the same again8 m", "30.9D + 1.0W8 m"}, ids)

	again, err := c.Combine([]statics.Combination{{ID: "half", Factors: factors("1.4D", 0.5)}})
	require.NoError(t, err)
	half, err := again.Reactions("half")
	require.NoError(t, err)
	require.InDelta(t, 0.7*10*4, inKN(half[0].Force), 1e-10)
}

// TestGoverning re-runs the combination that an extreme names and finds the
// extreme again, with the force that acts with it; and no other combination
// gives more.
func TestGoverning(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s := samples().Draw(t, "beam")
		cases := []string{"dead", "live", "wind"}
		var loads []statics.Load
		for i, l := range s.loads {
			loads = append(loads, statics.Load{Case: cases[i%3], Shape: l.shape(s.length)})
		}
		r, err := statics.Analyze(s.beam(), loads)
		require.NoError(t, err)
		used := slices.Collect(r.IDs())
		var combinations []statics.Combination
		for i := range rapid.IntRange(1, 6).Draw(t, "combinations") {
			c := statics.Combination{ID: fmt.Sprint(i)}
			for _, id := range used {
				c.Factors = append(c.Factors, statics.Factor{Case: id, Value: rapid.Float64Range(-2, 2).Draw(t, "factor")})
			}
			combinations = append(combinations, c)
		}
		sum, err := r.Combine(combinations)
		require.NoError(t, err)
		lines, err := sum.Lines(1)
		require.NoError(t, err)
		from := rapid.Float64Range(0, s.length).Draw(t, "from")
		to := rapid.Float64Range(from, s.length).Draw(t, "to")
		e, err := lines.Extremes(m(from), m(to))
		require.NoError(t, err)
		tol := 1e-11 * (s.size() + 1e-9) * (1 + s.length)
		for _, line := range lines.All() {
			alone, err := line.Extremes(m(from), m(to))
			require.NoError(t, err)
			require.LessOrEqual(t, inKNm(alone.MomentMost.Moment), inKNm(e.MomentMost.Moment)+tol)
			require.GreaterOrEqual(t, inKNm(alone.MomentLeast.Moment), inKNm(e.MomentLeast.Moment)-tol)
			require.LessOrEqual(t, inKN(alone.ShearMost.Shear), inKN(e.ShearMost.Shear)+tol)
			require.GreaterOrEqual(t, inKN(alone.ShearLeast.Shear), inKN(e.ShearLeast.Shear)-tol)
		}
		for _, f := range []statics.Forces{e.MomentMost, e.MomentLeast, e.ShearMost, e.ShearLeast} {
			line, err := lines.Line(f.ID)
			require.NoError(t, err)
			left, right, err := line.At(f.At)
			require.NoError(t, err)
			if f.Side == statics.Right {
				left = right
			}
			require.InDelta(t, inKNm(left.Moment), inKNm(f.Moment), tol)
			require.InDelta(t, inKN(left.Shear), inKN(f.Shear), tol)
		}
	})
}

// TestJump reads both sides of a point load and of a couple.
func TestJump(t *testing.T) {
	s := solve(t, oneSpan(statics.Pinned, 10, statics.Roller), one(point(4, 50), couple(8, 20)))
	left, right := s.at(t, 4)
	require.Equal(t, []statics.Side{statics.Left, statics.Right}, []statics.Side{left.Side, right.Side})
	require.InDelta(t, 28, inKN(left.Shear), 1e-12)
	require.InDelta(t, -22, inKN(right.Shear), 1e-12)
	require.Equal(t, left.Moment, right.Moment)
	left, right = s.at(t, 8)
	require.InDelta(t, 24, inKNm(left.Moment), 1e-12)
	require.InDelta(t, 44, inKNm(right.Moment), 1e-12)
	left, right = s.at(t, 2)
	require.Equal(t, left, right)
	require.Equal(t, statics.Both, left.Side)

	e, err := s.line.Extremes(m(4), m(8))
	require.NoError(t, err)
	require.Equal(t, statics.Left, e.ShearMost.Side)
	require.Equal(t, m(4), e.ShearMost.At)
	require.InDelta(t, 28, inKN(e.ShearMost.Shear), 1e-12, "both sides of the ends of the length count")
	require.InDelta(t, 112, inKNm(e.MomentMost.Moment), 1e-12)
	require.Equal(t, statics.Left, e.MomentLeast.Side)
	require.InDelta(t, 24, inKNm(e.MomentLeast.Moment), 1e-12)
}

// TestRoundingReadsAsZero checks that a moment known to vanish is zero, not
// what sums of binary fractions leave.
func TestRoundingReadsAsZero(t *testing.T) {
	s := solve(t, oneSpan(statics.Fixed, 0.7, statics.Free), one(point(0.1, 0.3), point(0.2, 0.1), point(0.3, 0.7)))
	left, _ := s.at(t, 0.5)
	require.Zero(t, left.Moment)
	require.Zero(t, left.Shear)
	require.Empty(t, s.line.AppendInflections(nil))
	require.Empty(t, s.line.AppendZeroShears(nil))

	s = solve(t, oneSpan(statics.Pinned, 0.7, statics.Roller), one(point(0.1, 0.3), strip(0.2, 0.3, 0.1, 0.7)))
	e := s.extremes(t)
	require.Zero(t, e.MomentLeast.Moment)
	require.Zero(t, e.MomentLeast.At)
	left, _ = s.at(t, 0.7)
	require.Zero(t, left.Moment)
}

// TestNearlyAtSupport puts a load beside a support by no more than rounding.
func TestNearlyAtSupport(t *testing.T) {
	for _, x := range []float64{6 - 1e-15, 6 + 1e-15, 6 * (1 - 1e-10), 6 * (1 + 1e-10), 6} {
		s := solve(t, oneSpan(statics.Pinned, 6, statics.Roller), one(point(x, 90)))
		require.Zero(t, s.extremes(t).ShearLeast.Shear)
		require.Equal(t, kN(90), s.reactions[1].Force)
	}
}
