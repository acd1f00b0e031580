package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

func assumption(t *testing.T, r *beam.Result, id string) beam.Assumption {
	t.Helper()
	for _, a := range r.Assumptions {
		if a.ID == id {
			return a
		}
	}
	require.Fail(t, "no assumption "+id)
	return beam.Assumption{}
}

// Tension control is assumed with φ = 0.90 and held against the bars as laid:
// 5 No. 9 in a 14 by 22 in. section strain to 0.004914, which is in transition
// under 318-14 (see TestStrainLimitByEdition).
func TestSettleTensionControl(t *testing.T) {
	demand := beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)}
	r, _ := checkUS(t, ACI31814(), []beam.Row{bottom(3, "#9"), top(2, "#4")}, nil, demand)
	a := assumption(t, r, assumeTensionControl)
	require.True(t, a.Holds)
	require.Contains(t, a.Found, "φ = 0.900")

	r, _ = checkUS(t, ACI31814(), []beam.Row{bottom(5, "#9"), top(2, "#4")}, func(b *beam.Brief) { b.Section.Depth = in(22) }, demand)
	a = assumption(t, r, assumeTensionControl)
	require.False(t, a.Holds)
	require.Contains(t, a.Found, "strain 0.00491 against 0.00500, transition")
	require.False(t, a.Decisive, "φ follows the strain that was found")
}

// #3 stirrups at 8 in. are Av/s = 0.0275 in., against 50 × 14/60000 = 0.0117:
// enough. In a beam 36 in. wide they are not: 50 × 36/60000 = 0.03.
func TestSettleLeastStirrups(t *testing.T) {
	demand := beam.Demand{Name: "1", Moment: units.KipFoot.Of(100), Shear: units.Kip.Of(10)}
	rows := []beam.Row{bottom(3, "#9"), top(2, "#4")}
	r, _ := checkUS(t, ACI31819(), rows, nil, demand)
	a := assumption(t, r, assumeLeastStirrups)
	require.True(t, a.Holds)
	require.Contains(t, a.Found, "0.42 of those provided")

	r, _ = checkUS(t, ACI31819(), []beam.Row{bottom(6, "#9"), top(2, "#4")}, func(b *beam.Brief) { b.Section.Width = in(36) }, demand)
	a = assumption(t, r, assumeLeastStirrups)
	require.False(t, a.Holds)
	require.Contains(t, a.Found, "row (c)")
}

// LeastTension of a problem: zero for a sense that is not bent, and no amount
// where even the strain limit carries too little. For 100 kip-ft at d = 21.5
// in.: a = 21.5 - √(21.5² - 2400/(0.9 × 0.85 × 4 × 14)) = 1.3449 in., As =
// 1.0670 in2, which is more than As,min = 200/60000 × 14 × 21.5 = 1.0033 in2.
func TestLeastTension(t *testing.T) {
	rows := []beam.Row{bottom(3, "#9"), top(2, "#4")}
	_, trial := checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	area, ok := ACI31819().LeastTension(trial.Problem, beam.Positive, in(21.5))
	require.True(t, ok)
	require.InDelta(t, 1.06696, area.In(units.SquareInch), 5e-5)
	area, ok = ACI31819().LeastTension(trial.Problem, beam.Negative, in(21.5))
	require.True(t, ok)
	require.True(t, area.IsZero())

	_, trial = checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(-2000)})
	_, ok = ACI31819().LeastTension(trial.Problem, beam.Negative, in(21.5))
	require.False(t, ok)
}
