package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// 9.3.1.1.2: concrete of 90 to 115 lb/ft3 (1440 to 1840 kg/m3) takes the
// multiplier 1.65 - 0.005 wc (1.65 - 0.0003 wc), not less than 1.09; lighter and
// heavier concrete takes none.
func TestLightweightMultiplierOfDepth(t *testing.T) {
	for _, c := range []struct {
		code    Code
		density units.Density
		want    float64
	}{
		{ACI31819(), units.PoundPerCubicFoot.Of(89.9), 1},
		{ACI31819(), units.PoundPerCubicFoot.Of(90), 1.2},
		{ACI31814(), units.PoundPerCubicFoot.Of(110), 1.1},
		{ACI31819(), units.PoundPerCubicFoot.Of(115), 1.09},
		{ACI31819(), units.PoundPerCubicFoot.Of(115.1), 1},
		{ACI31819M(), units.KilogramPerCubicMetre.Of(1439), 1},
		{ACI31819M(), units.KilogramPerCubicMetre.Of(1440), 1.218},
		{ACI31814M(), units.KilogramPerCubicMetre.Of(1840), 1.098},
		{ACI31819M(), units.KilogramPerCubicMetre.Of(1841), 1},
	} {
		p := problemOf(t, c.code, usBrief())
		for _, kind := range []beam.ConcreteKind{beam.SandLightweight, beam.AllLightweight} {
			p.Brief.Concrete.Kind, p.Brief.Concrete.Density = kind, c.density
			require.InEpsilon(t, c.want, c.code.e.tableDepth(p, 1).byWeight, 1e-12, "%s of %s", kind, c.density)
		}
		p.Brief.Concrete.Kind = beam.Normalweight
		require.Equal(t, 1.0, c.code.e.tableDepth(p, 1).byWeight)
	}
}

// Table 9.3.1.1 of 318M: the divisors of the inch-pound edition.
func TestLeastDepthOfEachSupportInMetric(t *testing.T) {
	for _, c := range []struct {
		left, right statics.SupportKind
		divisor     float64
		words       string
	}{
		{statics.Pinned, statics.Roller, 16, "simply supported"},
		{statics.Fixed, statics.Roller, 18.5, "one end continuous"},
		{statics.Fixed, statics.Fixed, 21, "both ends continuous"},
		{statics.Fixed, statics.Free, 8, "cantilever"},
	} {
		for _, code := range []Code{ACI31814M(), ACI31819M()} {
			p := problemOf(t, code, usBrief())
			p.Brief.Supports[0].Kind, p.Brief.Supports[1].Kind = c.left, c.right
			d := code.e.tableDepth(p, 1)
			require.Equal(t, c.divisor, d.divisor, c.words)
			require.Equal(t, c.words, d.support)
		}
	}
}

// The check of a span says what its supports are, or that it is shallow, and its
// working shows how the depth was found.
func TestLeastDepthInWords(t *testing.T) {
	b := usBrief()
	b.Section.Depth = units.Inch.Of(16.4) // least: 264/16 = 16.5 in.
	tr := &beam.Trial{Problem: problemOf(t, ACI31819(), b), Record: true}
	got := only(t, us19.appendDepth(nil, tr), "depth.minimum")
	require.Equal(t, beam.Fail, got.Outcome)
	require.Equal(t, noteShallow, got.Reason)
	require.Equal(t, "simply supported", got.Steps[0].Note)
	requireSymbols(t, &got, "ℓ", "fy", "kf", "h,min")

	tr.Brief.Section.Depth = units.Inch.Of(24)
	tr.Brief.Concrete.Kind, tr.Brief.Concrete.Density = beam.AllLightweight, units.PoundPerCubicFoot.Of(100)
	got = only(t, us19.appendDepth(nil, tr), "depth.minimum")
	require.Equal(t, beam.Pass, got.Outcome)
	require.Equal(t, "simply supported", got.Reason)
	requireSymbols(t, &got, "ℓ", "fy", "kf", "wc", "kw", "h,min")
}

// Whether demands alone belong to a deep beam is the caller's to see (9.9.1.1);
// of a span it is judged.
func TestDeepBeamIsNotJudgedOfDemandsAlone(t *testing.T) {
	demands := &beam.Trial{Problem: problemOf(t, ACI31819(), demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(100)}))}
	require.Equal(t, beam.NotJudged, only(t, us19.judgeWhole(nil, demands), "scope.deep-beam").Outcome)
	span := &beam.Trial{Problem: problemOf(t, ACI31819(), usBrief())}
	require.Empty(t, checksOf(us19.judgeWhole(nil, span), "scope.deep-beam"))
}
