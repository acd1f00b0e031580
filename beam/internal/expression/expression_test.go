package expression_test

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/internal/expression"
)

func TestEvaluate(t *testing.T) {
	known := map[string]float64{"f'c": 4000, "b": 14, "As,min": 2, "β1": 0.85, "As,4/3": 3}
	for text, want := range map[string]float64{
		"0.85 f'c b":                47600,
		"4 / 2 b":                   28,
		"2 (b + 1)^2 - √f'c * 0":    450,
		"max(As,min, 1, min(3, b))": 3,
		"-b / 7":                    -2,
		"√(b^2 + 4 2 b)":            math.Sqrt(196 + 112),
		"β1":                        0.85,
		"2 × As,4/3":                6,
		"1.5e-3 × b":                0.021,
	} {
		got, err := expression.Evaluate(text, known)
		require.NoError(t, err)
		require.InDelta(t, want, got, 1e-12, text)
	}
	for _, bad := range []string{"fy", "(b", "b )", "min b", ""} {
		_, err := expression.Evaluate(bad, known)
		require.Error(t, err, bad)
	}
}
