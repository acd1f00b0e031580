package aci318

import (
	"context"
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
	require.Contains(t, a.Found, "strain of 0.00491 against 0.00500: transition")
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

// Negative bending is settled like positive; a beam that nothing bends holds.
func TestSettleTensionControlOfEachSense(t *testing.T) {
	rows := []beam.Row{bottom(3, "#9"), top(3, "#9")}
	r, _ := checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(-100)})
	a := assumption(t, r, assumeTensionControl)
	require.True(t, a.Holds)
	require.Contains(t, a.Found, "negative bending: the extreme layer")
	require.NotContains(t, a.Found, "positive")

	r, _ = checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)}, beam.Demand{Name: "2", Moment: units.KipFoot.Of(-100)})
	require.Regexp(t, "^positive bending: .*; negative bending: ", assumption(t, r, assumeTensionControl).Found)

	r, _ = checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Shear: units.Kip.Of(10)})
	a = assumption(t, r, assumeTensionControl)
	require.True(t, a.Holds)
	require.Equal(t, "nothing is bent", a.Found)
}

// Without stirrups Vc is by row (c) of Table 22.5.5.1 of 318-19.
func TestSettleWithoutStirrups(t *testing.T) {
	b := demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	r, err := beam.CheckLayout(context.Background(), ACI31819(), b, beam.Layout{Longitudinal: []beam.Row{bottom(3, "#9"), top(2, "#4")}})
	require.NoError(t, err)
	a := assumption(t, r, assumeLeastStirrups)
	require.False(t, a.Holds)
	require.Equal(t, "there are no stirrups: Vc is by row (c)", a.Found)
}

// A beam with steel at its top alone is settled with the web of negative
// bending: #3 at 8 in. are Av/s = 0.0275 in., of which 50 × 14/60000 = 0.01167
// are needed (9.6.3.4), and d/2 = 10.8 in. allows them.
func TestSettleLeastStirrupsOfATopAlone(t *testing.T) {
	p := problemOf(t, ACI31819(), demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(-100), Shear: units.Kip.Of(10)}))
	tr := trialOf(t, p, "#3", nil, []group{{3, "#8"}})
	addZone(tr, 2, 8, 0, 0)
	var note beam.Register
	b := p.Brief
	require.Empty(t, ACI31819().Resolve(&b, &note))
	us19.settleLeastStirrups(tr, &note)
	a := assumption(t, &beam.Result{Assumptions: note.All()}, assumeLeastStirrups)
	require.True(t, a.Holds)
	require.Contains(t, a.Found, "0.42 of those provided")
}

// A cover of the brief's own below the table's is among what the engineer has
// to confirm.
func TestSettleListsOwnCover(t *testing.T) {
	r, _ := checkUS(t, ACI31819(), []beam.Row{bottom(3, "#9"), top(2, "#4")}, func(b *beam.Brief) { b.Cover = in(1) },
		beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	a := assumption(t, r, "cover.below-table")
	require.True(t, a.Open)
	require.Contains(t, a.Assumed, "1 in")
	require.Contains(t, a.Assumed, "1.5 in")
	require.Contains(t, a.Assumed, "Table 20.5.1.3.1")
}
