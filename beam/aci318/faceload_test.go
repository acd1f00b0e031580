package aci318

import (
	"context"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// A load over the face of a support presses on the support itself; 9.9.1.1(b)
// speaks of loads on the clear span. Both ends are treated alike, though the
// right one is found by subtraction.
func TestLoadAtTheFaceOfEitherSupport(t *testing.T) {
	for _, at := range []float64{6, 258} {
		b := usBrief()
		b.Spans = []units.Length{units.Inch.Of(264)}
		b.Supports[0].Width, b.Supports[1].Width = units.Inch.Of(12), units.Inch.Of(12)
		refused := func(at float64) bool {
			b.Loads = append(b.Loads[:1:1], beam.Load{Case: beam.Dead, Shape: beam.PointLoad, Force: units.Kip.Of(40), At: units.Inch.Of(at)})
			r, err := beam.Design(context.Background(), ACI31819(), b)
			require.NoError(t, err)
			for _, f := range r.Refusals {
				if f.Rule == "scope.load-within-2h" {
					return true
				}
			}
			return false
		}
		require.False(t, refused(at), "%g in", at)
		require.True(t, refused(at+map[bool]float64{true: 1, false: -1}[at < 100]), "%g in", at)
	}
}
