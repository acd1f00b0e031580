package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"
)

// Table 21.2.2 and 9.3.3.1. The values at 0.004 of 318-14 and the strain
// limits of 318-19 are own calculations from the clauses:
// 0.65 + 0.25 (0.004 - 0.002069)/(0.005 - 0.002069) = 0.8147, and so on.
func TestReductionOfFlexure(t *testing.T) {
	const grade60, grade80, grade100 = 60.0 / 29000, 80.0 / 29000, 100.0 / 29000
	for _, tc := range []struct {
		name          string
		rules         reductionRules
		strain, yield float64
		phi           float64
		class         string
	}{
		{"318-14 tension-controlled, met exactly", reduction14, 0.005, grade60, 0.90, tensionControlled},
		{"318-14 just below", reduction14, 0.00499, grade60, 0.8991471, transition},
		{"318-14 at the least strain, Grade 60", reduction14, 0.004, grade60, 0.8147059, transition},
		{"318-14 at the least strain, rounded", reduction14, 0.004, 0.002, 0.8166667, transition},
		{"318-14 at the least strain, Grade 80", reduction14, 0.004, grade80, 0.7884615, transition},
		{"318-14 at yield", reduction14, grade60, grade60, 0.65, compressionControlled},
		{"318-14 below yield", reduction14, 0.001, grade60, 0.65, compressionControlled},
		{"318-19 Grade 60 at 0.005 is in transition", reduction19, 0.005, grade60, 0.65 + 0.25*(0.005-grade60)/0.003, transition},
		{"318-19 Grade 60, met exactly", reduction19, grade60 + 0.003, grade60, 0.90, tensionControlled},
		{"318-19 rounded, met exactly", reduction19, 0.005, 0.002, 0.90, tensionControlled},
		{"318-19 Grade 80 below", reduction19, 0.0057, grade80, 0.65 + 0.25*(0.0057-grade80)/0.003, transition},
		{"318-19 Grade 80 above", reduction19, 0.00576, grade80, 0.90, tensionControlled},
		{"318-19 Grade 100 above", reduction19, 0.00645, grade100, 0.90, tensionControlled},
		{"318-19 halfway", reduction19, grade60 + 0.0015, grade60, 0.775, transition},
		{"318-19 tension face in compression", reduction19, -0.001, grade60, 0.65, compressionControlled},
	} {
		t.Run(tc.name, func(t *testing.T) {
			phi, class := tc.rules.flexure(tc.strain, tc.yield)
			require.InDelta(t, tc.phi, phi, 1e-7)
			require.Equal(t, tc.class, class)
		})
	}
	require.Equal(t, 0.004, reduction14.leastStrain(grade60))
	require.Equal(t, 0.004, reduction14.leastStrain(grade80))
	require.InDelta(t, 0.005069, reduction19.leastStrain(grade60), 5e-7)
	require.InDelta(t, 0.005759, reduction19.leastStrain(grade80), 5e-7)
	require.InDelta(t, 0.006448, reduction19.leastStrain(grade100), 5e-7)
	require.Equal(t, 0.75, reduction14.shear)
	require.Equal(t, 0.75, reduction19.shear)
	require.Equal(t, 0.75, reduction14.torsion)
	require.Equal(t, 0.75, reduction19.torsion)
}
