package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/units"
)

// 9.6.1.2 with both expressions, and the cap on fy of 318-19. The expressions
// meet at (200/3)² = 4444 psi and (1.4/0.25)² = 31.36 MPa.
func TestMinimumSteel(t *testing.T) {
	for _, tc := range []struct {
		name            string
		code            Code
		strength, yield units.Stress
		ratio           float64 // As,min / (bw d)
		capped          bool
	}{
		{"floor governs", ACI31814(), psi(4000), psi(60000), 200.0 / 60000, false},
		{"just below the crossing", ACI31819(), psi(4444), psi(60000), 200.0 / 60000, false},
		{"just above the crossing", ACI31819(), psi(4445), psi(60000), 3 * math.Sqrt(4445) / 60000, false},
		{"root governs", ACI31814(), psi(6000), psi(60000), 3 * math.Sqrt(6000) / 60000, false},
		{"Grade 80 is not capped", ACI31819(), psi(6000), psi(80000), 3 * math.Sqrt(6000) / 80000, false},
		{"Grade 100 counts with 80", ACI31819(), psi(6000), psi(100000), 3 * math.Sqrt(6000) / 80000, true},
		{"SI, floor governs", ACI31819M(), mpa(31.3), mpa(420), 1.4 / 420, false},
		{"SI, root governs", ACI31819M(), mpa(31.4), mpa(420), 0.25 * math.Sqrt(31.4) / 420, false},
		{"SI, Grade 690 counts with 550", ACI31819M(), mpa(40), mpa(690), 0.25 * math.Sqrt(40) / 550, true},
		{"SI, Grade 550 under 318M-14", ACI31814M(), mpa(40), mpa(550), 0.25 * math.Sqrt(40) / 550, false},
	} {
		t.Run(tc.name, func(t *testing.T) {
			width, depth := in(14), in(21)
			m := tc.code.e.minimumSteel(tc.strength, tc.yield, tc.code.e.minimumWidth(width, width, true), depth)
			require.InEpsilon(t, tc.ratio, tc.code.e.areaOf(m.area).Ratio(width.MulLength(depth)), 1e-12)
			require.Equal(t, tc.capped, m.capped)
		})
	}
}
