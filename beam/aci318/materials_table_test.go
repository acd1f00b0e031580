package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// The coefficients of chapters 19, 20 and 22.2 as each edition prints them: in
// the order 318-14, 318M-14, 318-19, 318M-19. From memory, but for β1, Ec, fr and
// the yield strengths, which the published examples elsewhere in these tests use.
func TestCoefficientsOfMaterials(t *testing.T) {
	editions := []*materialRules{&materials14US, &materials14SI, &materials19US, &materials19SI}
	for _, row := range []struct {
		name string
		of   func(m *materialRules) float64
		want [4]float64
	}{
		{"least f'c, 19.2.1.1", func(m *materialRules) float64 { return m.leastStrength }, [4]float64{2500, 17, 2500, 17}},
		{"β1 of 0.85 up to, Table 22.2.2.4.3", func(m *materialRules) float64 { return m.blockFull }, [4]float64{4000, 28, 4000, 28}},
		{"β1 of 0.65 from, Table 22.2.2.4.3", func(m *materialRules) float64 { return m.blockLeast }, [4]float64{8000, 55, 8000, 55}},
		{"Ec by density, 19.2.2.1(a)", func(m *materialRules) float64 { return m.concreteByDensity }, [4]float64{33, 0.043, 33, 0.043}},
		{"Ec by strength, 19.2.2.1(b)", func(m *materialRules) float64 { return m.concreteByStrength }, [4]float64{57000, 4700, 57000, 4700}},
		{"lightest concrete, 19.2.2.1(a)", func(m *materialRules) float64 { return m.lightest }, [4]float64{90, 1440, 90, 1440}},
		{"heaviest concrete, 19.2.2.1(a)", func(m *materialRules) float64 { return m.heaviest }, [4]float64{160, 2560, 160, 2560}},
		{"lightweight up to, chapter 2", func(m *materialRules) float64 { return m.lightLimit }, [4]float64{115, 1840, 135, 2160}},
		{"normalweight from, chapter 2", func(m *materialRules) float64 { return m.normalLeast }, [4]float64{135, 2160, 135, 2160}},
		{"fr, 19.2.3.1", func(m *materialRules) float64 { return m.rupture }, [4]float64{7.5, 0.62, 7.5, 0.62}},
		{"density with bars, common practice", func(m *materialRules) float64 { return m.usualDensity }, [4]float64{150, 2450, 150, 2450}},
		{"aggregate, common practice", func(m *materialRules) float64 { return m.usualAggregate }, [4]float64{0.75, 20, 0.75, 20}},
		{"λ of 1 above, Table 19.2.4.1(a)", func(m *materialRules) float64 { return m.lambdaHigh }, [4]float64{0, 0, 135, 2160}},
		{"Es, 20.2.2.2", func(m *materialRules) float64 { return m.steelModulus }, [4]float64{29e6, 200000, 29e6, 200000}},
		{"lowest grade, Table 20.2.1.3", func(m *materialRules) float64 { return m.leastYield }, [4]float64{40000, 280, 40000, 280}},
		{"fy in flexure, Table 20.2.2.4", func(m *materialRules) float64 { return m.mostYield }, [4]float64{80000, 550, 100000, 690}},
		{"fyt in shear, Table 20.2.2.4", func(m *materialRules) float64 { return m.mostShearYield }, [4]float64{60000, 420, 60000, 420}},
		{"fy in torsion, Table 20.2.2.4", func(m *materialRules) float64 { return m.mostTorsionYield }, [4]float64{60000, 420, 60000, 420}},
	} {
		for i, m := range editions {
			require.InDelta(t, row.want[i], row.of(m), 1e-9, "%s, edition %d", row.name, i)
		}
	}
}

// What Materials says of stirrups and of bars outside the tables.
func TestMaterialsOfStirrups(t *testing.T) {
	m := ACI31819().Materials(beam.Concrete{Strength: psi(4000)}, beam.Reinforcement{Yield: psi(80000)}, beam.Readings{})
	require.InDelta(t, 60, m.ShearYield.In(units.KSI), 1e-9, "as the bars, capped")
	require.True(t, m.ShearYieldCapped)
	m = ACI31819().Materials(beam.Concrete{Strength: psi(4000)}, beam.Reinforcement{Yield: psi(80000), StirrupYield: psi(40000)}, beam.Readings{})
	require.InDelta(t, 40, m.ShearYield.In(units.KSI), 1e-9)
	require.False(t, m.ShearYieldCapped)

	m = ACI31819().Materials(beam.Concrete{Strength: psi(2000)}, beam.Reinforcement{Yield: psi(39000)}, beam.Readings{})
	require.Len(t, m.Refusals, 2)
	require.Equal(t, "19.2.1.1", m.Refusals[0].Clause)
	require.Equal(t, "Table 20.2.1.3", m.Refusals[1].Clause)
	require.Contains(t, m.Refusals[1].Detail, "lowest grade")
}

// A density is taken up to both bounds of its kind of concrete.
func TestDensitiesAtTheirBounds(t *testing.T) {
	for _, tc := range []struct {
		kind    beam.ConcreteKind
		density float64
		wrong   bool
	}{
		{beam.Normalweight, 135, false}, {beam.Normalweight, 160, false}, {beam.Normalweight, 134.9, true}, {beam.Normalweight, 160.1, true},
		{beam.SandLightweight, 90, false}, {beam.SandLightweight, 115, false}, {beam.SandLightweight, 89.9, true}, {beam.SandLightweight, 115.1, true},
	} {
		fault, wrong := ACI31814().e.densityFault(&beam.Concrete{Kind: tc.kind, Density: units.PoundPerCubicFoot.Of(tc.density)})
		require.Equal(t, tc.wrong, wrong, "%s of %v lb/ft3", tc.kind, tc.density)
		require.NotEmpty(t, fault.Allowed)
	}
}
