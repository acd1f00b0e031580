package mechanics_test

import (
	"errors"
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// US inputs are in in., in2 and ksi, SI inputs in mm, mm2 and MPa.
var (
	in  = units.Inch.Of
	in2 = units.SquareInch.Of
	ksi = units.KSI.Of
	mm  = units.Millimetre.Of
	mm2 = units.SquareMillimetre.Of
	mpa = units.Megapascal.Of
)

// whitney is the block of ACI 318-19 22.2.2.4: 0.85 f'c over beta1 times the
// neutral-axis depth, at an ultimate strain of 0.003.
func whitney(t testing.TB, strength units.Stress, beta1 float64) mechanics.Law {
	t.Helper()
	law, err := mechanics.RectangularBlock(strength.Scale(0.85), beta1, 0.003)
	require.NoError(t, err)
	return law
}

func layerUS(depth, area, yield float64) mechanics.Layer {
	return mechanics.Layer{Depth: in(depth), Area: in2(area), Steel: mechanics.Steel{Modulus: ksi(29000), Yield: ksi(yield)}}
}

func layerSI(depth, area, yield float64) mechanics.Layer {
	return mechanics.Layer{Depth: mm(depth), Area: mm2(area), Steel: mechanics.Steel{Modulus: mpa(200000), Yield: mpa(yield)}}
}

// cases is how many random cases a test tries: a twentieth when tests run short.
func cases(n int) int {
	if testing.Short() {
		return max(1, n/20)
	}
	return n
}

func solve(t testing.TB, s mechanics.Section, law mechanics.Law, b mechanics.Bending) mechanics.Ultimate {
	t.Helper()
	u, err := s.Ultimate(law, b)
	require.NoError(t, err)
	return u
}

func asEither(err error, none **mechanics.NoEquilibriumError, input **mechanics.InputError) bool {
	return errors.As(err, none) || errors.As(err, input)
}

func requireFinite(t testing.TB, values ...float64) {
	t.Helper()
	for i, v := range values {
		if math.IsNaN(v) || math.IsInf(v, 0) {
			t.Fatalf("value %d is %v", i, v)
		}
	}
}
