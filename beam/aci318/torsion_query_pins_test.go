package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// A layer just above mid-depth is of the upper half, one just below of the
// lower; each half bears half of Al (9.5.4.3).
func TestLayersAreSharedByHalves(t *testing.T) {
	for depth, lower := range map[float64]float64{12.9: 0, 13: 0.31, 13.1: 0.62} {
		s := twistedStrengths(t, ACI31819(), func(q *beam.SectionQuery) { q.Layers[1].Depth = in(depth) })
		require.InEpsilon(t, 3.16+lower, valueIn(t, checkOf(t, s.Checks, "torsion.longitudinal.bottom").Capacity, "in2"), 1e-12, "%g", depth)
		require.InEpsilon(t, 1.32+0.62-lower, valueIn(t, checkOf(t, s.Checks, "torsion.longitudinal.top").Capacity, "in2"), 1e-12, "%g", depth)
	}
}

// A torque that is neglected asks for no steel, so that compression relieves
// none: Tn by 22.7.6.1(b) is that of the bars as they are. 0.2 in2 above;
// 2 Ao fy/ph = 2 × 239.0625 × 60,000/70 for each in2.
func TestStrengthBesideANeglectedTorque(t *testing.T) {
	s := twistedStrengths(t, ACI31819(), func(q *beam.SectionQuery) {
		q.Demand.Torque = units.KipFoot.Of(5)
		q.Layers = []beam.SteelLayer{q.Layers[0], {Area: in2(0.2), Depth: in(2.5), Yield: psi(60000)}}
	})
	require.True(t, s.Torsion.MayBeNeglected)
	require.InEpsilon(t, 2*239.0625*60000/70*2*0.2, s.Torsion.Nominal.In(units.PoundInch), 1e-9)
	require.Zero(t, s.Torsion.Longitudinal)
	require.Zero(t, s.Torsion.Section)
}

// A cage of next to no area is one still: x1 = 0.06 and y1 = 10.06 in.
func TestSmallestCage(t *testing.T) {
	s := twistedStrengths(t, ACI31819(), func(q *beam.SectionQuery) { q.Stirrups.Cover = in(7.72) })
	const area, perimeter = 0.06 * 10.06, 2 * (0.06 + 10.06)
	at := 30 * 12000 / (2 * 0.75 * 0.85 * area * 60000)
	require.InEpsilon(t, at, s.Torsion.Transverse.In(units.SquareInchPerInch), 1e-9)
	require.InEpsilon(t, at*perimeter, s.Torsion.Longitudinal.In(units.SquareInch), 1e-9)
}

// Where the moment takes all of the tension steel nothing is left for a torque,
// and the strength is not below nothing.
func TestNothingLeftForATorque(t *testing.T) {
	s := twistedStrengths(t, ACI31819(), func(q *beam.SectionQuery) {
		q.Demand.Moment = units.KipFoot.Of(500)
		q.Layers = []beam.SteelLayer{q.Layers[0], q.Layers[2]}
	})
	require.Zero(t, s.Torsion.Nominal)
	require.Zero(t, s.Torsion.Design)
	s = twistedStrengths(t, ACI31819(), func(q *beam.SectionQuery) { q.Demand.Shear = units.Kip.Of(400) })
	require.Zero(t, s.Torsion.Nominal, "the legs are taken by the shear")
}

// θ stands from 30 to 60 degrees (22.7.6.1.2).
func TestAnglesOutsideTheirRange(t *testing.T) {
	for angle, wrong := range map[float64]bool{0: false, 29.8: true, 30: false, 60: false, 60.3: true} {
		fault, got := angleFault(angle)
		require.Equal(t, wrong, got, "%g", angle)
		if wrong {
			require.Equal(t, "30 to 60 degrees (22.7.6.1.2)", fault.Allowed)
		}
	}
}

// What limits a strength is said beside it: √f'c (22.7.2.1), fyt (20.2.2.4) and a
// cage without room.
func TestNotesOfATorsionStrength(t *testing.T) {
	for says, edit := range map[string]func(q *beam.SectionQuery){
		"√f'c is capped":          func(q *beam.SectionQuery) { q.Concrete.Strength = psi(12000) },
		"of their yield strength": func(q *beam.SectionQuery) { q.Stirrups.Yield = psi(80000) },
		noteNoCage:                func(q *beam.SectionQuery) { q.Stirrups.Cover = in(8) },
	} {
		notes := twistedStrengths(t, ACI31819(), edit).Torsion.Notes
		require.Len(t, notes, 1, says)
		require.Contains(t, notes[0], says)
	}
}
