package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// λ by every route. 318-14: Table 19.2.4.2 with linear interpolation of blends,
// or fct/(6.7√fcm) of 19.2.4.3 (0.56 in SI), at most 1; 318-19: blends by
// composition, the rest by density, never by splitting strength.
func TestLightweightByEveryRoute(t *testing.T) {
	pcf := units.PoundPerCubicFoot.Of
	kg := units.KilogramPerCubicMetre.Of
	for _, k := range []struct {
		name   string
		e      *edition
		c      beam.Concrete
		want   float64
		clause string
		route  string
	}{
		{"normalweight 14", &us14, beam.Concrete{Kind: beam.Normalweight}, 1, "19.2.4.2", ""},
		{"not stated 19", &us19, beam.Concrete{}, 1, "19.2.4.1", ""},
		{"sand 14", &us14, beam.Concrete{Kind: beam.SandLightweight, Density: pcf(110)}, 0.85, "Table 19.2.4.2", routeMix},
		{"all 14M", &si14, beam.Concrete{Kind: beam.AllLightweight, Density: kg(1700)}, 0.75, "Table 19.2.4.2", routeMix},
		{"fine blend, none normal", &us14, beam.Concrete{Kind: beam.FineBlend}, 0.75, "Table 19.2.4.2", routeMix},
		{"fine blend, 40 % normal", &us14, beam.Concrete{Kind: beam.FineBlend, Normal: 0.4}, 0.79, "Table 19.2.4.2", routeMix},
		{"fine blend, all normal", &si14, beam.Concrete{Kind: beam.FineBlend, Normal: 1}, 0.85, "Table 19.2.4.2", routeMix},
		{"coarse blend, none normal", &si14, beam.Concrete{Kind: beam.CoarseBlend}, 0.85, "Table 19.2.4.2", routeMix},
		{"coarse blend, 40 % normal", &us14, beam.Concrete{Kind: beam.CoarseBlend, Normal: 0.4}, 0.91, "Table 19.2.4.2", routeMix},
		{"coarse blend, all normal", &us14, beam.Concrete{Kind: beam.CoarseBlend, Normal: 1}, 1, "Table 19.2.4.2", routeMix},
		{"fine blend 19, whatever its density", &us19, beam.Concrete{Kind: beam.FineBlend, Normal: 0.4, Density: pcf(120)}, 0.79, "Table 19.2.4.1(b)", routeMix},
		{"coarse blend 19M", &si19, beam.Concrete{Kind: beam.CoarseBlend, Normal: 0.5, Density: kg(1500)}, 0.925, "Table 19.2.4.1(b)", routeMix},
		{"all-lightweight 19 by density", &us19, beam.Concrete{Kind: beam.AllLightweight, Density: pcf(120)}, 0.9, "Table 19.2.4.1(a)", routeDensity},

		// √4900 = 70 psi: 375.2/(6.7 × 70) = 0.8; √25 = 5 MPa: 2.24/(0.56 × 5) = 0.8.
		{"splitting 14", &us14, beam.Concrete{Kind: beam.SandLightweight, Strength: psi(4900), Splitting: psi(375.2)}, 0.8, "19.2.4.3", routeSplitting},
		{"splitting 14M", &si14, beam.Concrete{Kind: beam.AllLightweight, Strength: mpa(25), Splitting: mpa(2.24)}, 0.8, "19.2.4.3", routeSplitting},
		{"splitting 14 goes before a blend", &us14, beam.Concrete{Kind: beam.FineBlend, Strength: psi(4900), Splitting: psi(375.2)}, 0.8, "19.2.4.3", routeSplitting},
		{"splitting 14 at one", &us14, beam.Concrete{Kind: beam.SandLightweight, Strength: psi(4900), Splitting: psi(469)}, 1, "19.2.4.3", routeSplitting},
		{"splitting 14 capped at one", &us14, beam.Concrete{Kind: beam.SandLightweight, Strength: psi(4900), Splitting: psi(500)}, 1, "19.2.4.3", routeSplitting},
		{"splitting 19 is no route", &us19, beam.Concrete{Kind: beam.SandLightweight, Strength: psi(4900), Splitting: psi(375.2), Density: pcf(110)}, 0.825, "Table 19.2.4.1(a)", routeDensity},
		{"splitting 19M is no route", &si19, beam.Concrete{Kind: beam.FineBlend, Strength: mpa(25), Splitting: mpa(2.24), Normal: 0.5}, 0.8, "Table 19.2.4.1(b)", routeMix},
	} {
		t.Run(k.name, func(t *testing.T) {
			l := k.e.lightness(&k.c)
			require.InDelta(t, k.want, l.factor, 1e-12)
			require.Equal(t, k.clause, l.clause)
			require.Equal(t, k.route, l.route)
			require.Equal(t, l.factor, k.e.lambda(&k.c))
		})
	}
}

// Blends are lightweight concrete: they need a density, take expression (a) for
// Ec, and a coarse blend may be as heavy as the lightest normalweight concrete.
func TestBlendsAreLightweightConcrete(t *testing.T) {
	pcf := units.PoundPerCubicFoot.Of
	for _, k := range []struct {
		kind    beam.ConcreteKind
		density units.Density
		wrong14 bool
	}{
		{beam.FineBlend, units.Density{}, true},
		{beam.FineBlend, pcf(115), false},
		{beam.FineBlend, pcf(116), true},
		{beam.FineBlend, pcf(89), true},
		{beam.CoarseBlend, pcf(116), false},
		{beam.CoarseBlend, pcf(135), false},
		{beam.CoarseBlend, pcf(136), true},
		{beam.SandLightweight, pcf(116), true},
		{beam.Normalweight, pcf(134), true},
		{beam.Normalweight, units.Density{}, false},
	} {
		_, wrong := us14.densityFault(&beam.Concrete{Kind: k.kind, Density: k.density})
		require.Equal(t, k.wrong14, wrong, "%s %s", k.kind, k.density)
	}
	_, clause := us14.elasticModulus(&beam.Concrete{Strength: psi(4000), Kind: beam.CoarseBlend, Density: pcf(120)})
	require.Equal(t, "19.2.2.1.a", clause)
	require.False(t, isLight(0))
	require.False(t, isLight(beam.Normalweight))
	require.True(t, isLight(beam.SandLightweight))
}

// Which route was taken, and which other value was left aside, is listed.
func TestRouteToLambdaIsListed(t *testing.T) {
	for _, k := range []struct {
		name string
		code Code
		c    beam.Concrete
		says []string // of reading.lightweight; none: not listed
		open bool     // concrete.splitting
	}{
		{"normalweight", ACI31819(), beam.Concrete{}, nil, false},
		{"density", ACI31819(), beam.Concrete{Kind: beam.SandLightweight, Density: units.PoundPerCubicFoot.Of(110)},
			[]string{"λ = 0.825 by the equilibrium density (Table 19.2.4.1(a))", "the composition, which may be gone by instead, is not used"}, false},
		{"blend", ACI31819(), beam.Concrete{Kind: beam.FineBlend, Normal: 0.4, Density: units.PoundPerCubicFoot.Of(110)},
			[]string{"λ = 0.79 by the composition of the aggregate", "the density, which may be gone by instead, is not used"}, false},
		{"splitting in 318-19", ACI31819(), beam.Concrete{Kind: beam.SandLightweight, Density: units.PoundPerCubicFoot.Of(110), Splitting: psi(300)},
			[]string{"this edition does not go by the splitting tensile strength"}, false},
		{"splitting in 318-14", ACI31814(), beam.Concrete{Kind: beam.SandLightweight, Density: units.PoundPerCubicFoot.Of(110), Splitting: psi(375.2)},
			[]string{"λ = 0.8 by the splitting tensile strength (19.2.4.3)"}, true},
	} {
		t.Run(k.name, func(t *testing.T) {
			b := bare()
			b.Concrete = k.c
			b.Concrete.Strength = psi(4900)
			listed := assumptionsOf(t, k.code, b)
			a, ok := listed["reading.lightweight"]
			require.Equal(t, len(k.says) > 0, ok)
			for _, s := range k.says {
				require.Contains(t, a.Assumed, s)
			}
			o, ok := listed["concrete.splitting"]
			require.Equal(t, k.open, ok)
			require.Equal(t, k.open, o.Open)
		})
	}
}

// assumptionsOf lists what a brief leaves open, by id.
func assumptionsOf(t *testing.T, c Code, b beam.Brief) map[string]beam.Assumption {
	t.Helper()
	var note beam.Register
	require.Empty(t, c.Resolve(&b, &note))
	out := map[string]beam.Assumption{}
	for _, a := range note.All() {
		out[a.ID] = a
	}
	return out
}
