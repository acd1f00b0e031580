package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

var (
	psi = units.PSI.Of
	mpa = units.Megapascal.Of
	in  = units.Inch.Of
	mm  = units.Millimetre.Of
	in2 = units.SquareInch.Of
	mm2 = units.SquareMillimetre.Of
)

// Table 22.2.2.4.3 of 318-14 and 318-19, in both systems of units, on both
// sides of every branch.
func TestBlockFactor(t *testing.T) {
	for _, tc := range []struct {
		name     string
		code     Code
		strength units.Stress
		want     float64
	}{
		{"least strength", ACI31819(), psi(2500), 0.85},
		{"last of the full branch", ACI31819(), psi(4000), 0.85},
		{"just above it", ACI31819(), psi(4001), 0.85 - 0.05*0.001},
		{"on the line", ACI31819(), psi(5000), 0.80},
		{"on the line, 318-14", ACI31814(), psi(6500), 0.725},
		{"last of the line", ACI31819(), psi(7999), 0.65 + 0.05*0.001},
		{"first of the least branch", ACI31819(), psi(8000), 0.65},
		{"high strength", ACI31814(), psi(12000), 0.65},
		{"SI, last of the full branch", ACI31819M(), mpa(28), 0.85},
		{"SI, on the line", ACI31819M(), mpa(35), 0.80},
		{"SI, just below the step", ACI31819M(), mpa(54.999), 0.85 - 0.05*26.999/7}, // 0.657: a clamp would stay there
		{"SI, the step", ACI31819M(), mpa(55), 0.65},
		{"SI, above the step where the line is above 0.65", ACI31814M(), mpa(55.5), 0.65},
		{"SI, high strength", ACI31814M(), mpa(80), 0.65},
	} {
		t.Run(tc.name, func(t *testing.T) {
			require.InDelta(t, tc.want, tc.code.e.blockFactor(tc.strength), 1e-12)
		})
	}
}

// Table 19.2.4.2 of 318-14 (composition) and Table 19.2.4.1(a) of 318-19
// (equilibrium density).
func TestLambda(t *testing.T) {
	pcf, kg := units.PoundPerCubicFoot.Of, units.KilogramPerCubicMetre.Of
	for _, tc := range []struct {
		name    string
		code    Code
		kind    beam.ConcreteKind
		density units.Density
		want    float64
	}{
		{"normalweight", ACI31819(), beam.Normalweight, pcf(145), 1},
		{"318-14 sand-lightweight, whatever its density", ACI31814(), beam.SandLightweight, pcf(100), 0.85},
		{"318-14 all-lightweight", ACI31814(), beam.AllLightweight, pcf(100), 0.75},
		{"318M-14 sand-lightweight", ACI31814M(), beam.SandLightweight, kg(1800), 0.85},
		{"318-19 at the lower step", ACI31819(), beam.AllLightweight, pcf(100), 0.75},
		{"318-19 below it", ACI31819(), beam.SandLightweight, pcf(95), 0.75},
		{"318-19 just above it", ACI31819(), beam.SandLightweight, pcf(101), 0.7575},
		{"318-19 on the line", ACI31819(), beam.SandLightweight, pcf(120), 0.9},
		{"318-19 line above one", ACI31819(), beam.SandLightweight, pcf(135), 1},
		{"318M-19 at the lower step", ACI31819M(), beam.SandLightweight, kg(1600), 0.75},
		{"318M-19 just above it: the printed line steps", ACI31819M(), beam.SandLightweight, kg(1601), 0.00047 * 1601},
		{"318M-19 on the line", ACI31819M(), beam.SandLightweight, kg(1900), 0.893},
		{"318M-19 capped at one", ACI31819M(), beam.SandLightweight, kg(2150), 1},
		{"318M-19 at the upper step", ACI31819M(), beam.SandLightweight, kg(2160), 1},
	} {
		t.Run(tc.name, func(t *testing.T) {
			require.InDelta(t, tc.want, tc.code.e.lambda(&beam.Concrete{Kind: tc.kind, Density: tc.density}), 1e-12)
		})
	}
}

// 19.2.2.1, 19.2.3.1, 20.2.2.2 and 21.2.2.1. At 145 lb/ft3 expression (a)
// gives 57,620 √f'c, not 57,000: normalweight concrete takes (b).
func TestMaterials(t *testing.T) {
	steel := beam.Reinforcement{Yield: psi(60000)}
	m := ACI31819().Materials(beam.Concrete{Strength: psi(4000)}, steel, beam.Readings{})
	require.InEpsilon(t, 57000*63.24555320336759, m.ElasticModulus.In(units.PSI), 1e-12)
	require.Equal(t, "19.2.2.1.b", m.ModulusClause)
	require.InEpsilon(t, 7.5*63.24555320336759, m.RuptureModulus.In(units.PSI), 1e-12)
	require.InEpsilon(t, 60.0/29000, m.YieldStrain, 1e-12)
	require.InEpsilon(t, 29e6, m.SteelModulus.In(units.PSI), 1e-12)
	require.Empty(t, m.Refusals)

	light := beam.Concrete{Strength: psi(4000), Kind: beam.SandLightweight, Density: units.PoundPerCubicFoot.Of(110)}
	m = ACI31814().Materials(light, steel, beam.Readings{})
	require.InEpsilon(t, 33*1153.689732987167*63.24555320336759, m.ElasticModulus.In(units.PSI), 1e-12) // 110^1.5
	require.Equal(t, "19.2.2.1.a", m.ModulusClause)
	require.InEpsilon(t, 7.5*0.85*63.24555320336759, m.RuptureModulus.In(units.PSI), 1e-12)

	m = ACI31819M().Materials(beam.Concrete{Strength: mpa(30)}, beam.Reinforcement{Yield: mpa(420)}, beam.Readings{})
	require.InEpsilon(t, 4700*5.477225575051661, m.ElasticModulus.In(units.Megapascal), 1e-12)
	require.InEpsilon(t, 0.62*5.477225575051661, m.RuptureModulus.In(units.Megapascal), 1e-12)
	require.InEpsilon(t, 0.0021, m.YieldStrain, 1e-12)
}

// 21.2.2.1 permits 0.002 for Grade 60 (420) alone.
func TestRoundedYieldStrainIsForGrade60Only(t *testing.T) {
	for _, tc := range []struct {
		name    string
		code    Code
		yield   units.Stress
		rounded bool
		want    float64
	}{
		{"Grade 60 exact", ACI31819(), psi(60000), false, 60.0 / 29000},
		{"Grade 60 rounded", ACI31819(), psi(60000), true, 0.002},
		{"Grade 60 rounded, 318-14", ACI31814(), psi(60000), true, 0.002},
		{"Grade 80 is not rounded", ACI31819(), psi(80000), true, 80.0 / 29000},
		{"Grade 40 is not rounded", ACI31819(), psi(40000), true, 40.0 / 29000},
		{"Grade 420 rounded", ACI31819M(), mpa(420), true, 0.002},
		{"Grade 550 is not rounded", ACI31819M(), mpa(550), true, 0.00275},
	} {
		t.Run(tc.name, func(t *testing.T) {
			require.InDelta(t, tc.want, tc.code.e.yieldStrain(tc.yield, tc.rounded), 1e-15)
		})
	}
}

// Table 20.2.2.4a of 318-14 and 20.2.2.4(a) of 318-19.
func TestYieldLimits(t *testing.T) {
	concrete := beam.Concrete{Strength: psi(4000)}
	refused := func(c Code, yield units.Stress) bool { return len(c.e.materialRefusals(&concrete, yield)) > 0 }
	require.False(t, refused(ACI31814(), psi(80000)))
	require.True(t, refused(ACI31814(), psi(80001)))
	require.False(t, refused(ACI31819(), psi(100000)))
	require.True(t, refused(ACI31819(), psi(100100)))
	require.False(t, refused(ACI31814M(), mpa(550)))
	require.True(t, refused(ACI31814M(), mpa(551)))
	require.False(t, refused(ACI31819M(), mpa(690)))
	require.True(t, refused(ACI31819M(), mpa(691)))
	require.False(t, refused(ACI31819(), psi(40000)))
	require.True(t, refused(ACI31819(), psi(39000)))
	require.False(t, refused(ACI31819M(), mpa(280)))
	require.True(t, refused(ACI31819M(), mpa(279)))

	for _, c := range []Code{ACI31814(), ACI31819()} {
		fyt, capped := c.e.shearYield(psi(60000))
		require.False(t, capped)
		require.Equal(t, psi(60000), fyt)
		fyt, capped = c.e.shearYield(psi(80000))
		require.True(t, capped)
		require.Equal(t, psi(60000), fyt)
	}
	fyt, capped := ACI31819M().e.shearYield(mpa(550))
	require.True(t, capped)
	require.Equal(t, mpa(420), fyt)
}

// 19.2.1.1: 2500 psi or 17 MPa, met exactly.
func TestLeastConcreteStrength(t *testing.T) {
	steel := beam.Reinforcement{Yield: psi(60000)}
	for _, tc := range []struct {
		code     Code
		strength units.Stress
		refused  bool
	}{
		{ACI31819(), psi(2500), false},
		{ACI31819(), psi(2499), true},
		{ACI31814M(), mpa(17), false},
		{ACI31814M(), mpa(16.9), true},
		{ACI31819(), psi(20000), false}, // no upper limit for normalweight concrete
	} {
		m := tc.code.Materials(beam.Concrete{Strength: tc.strength}, steel, beam.Readings{})
		require.Equal(t, tc.refused, len(m.Refusals) > 0, "%s under %s", tc.strength, tc.code.e.id)
		if tc.refused {
			require.Equal(t, "scope.concrete-strength", m.Refusals[0].Rule)
			require.Equal(t, "19.2.1.1", m.Refusals[0].Clause)
		}
	}
}
