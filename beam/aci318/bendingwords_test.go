package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// What the checks of bending say, and that they say it only where it holds.
func TestReasonsOfBending(t *testing.T) {
	rows := []beam.Row{bottom(3, "#9"), top(2, "#4")}
	at := func(rows []beam.Row, demands ...beam.Demand) *beam.Check {
		r, _ := checkUS(t, ACI31819(), rows, nil, demands...)
		return find1(t, r, "flexure.positive")
	}
	bend := func(axial float64) beam.Demand {
		return beam.Demand{Name: "wind", Moment: units.KipFoot.Of(100), Axial: units.Kip.Of(axial)}
	}
	c := at(rows, bend(0))
	require.Empty(t, c.Reason)
	require.Equal(t, "under wind", c.Steps[0].Note)
	require.False(t, c.HasAt)
	require.Contains(t, at(rows, bend(-20)).Reason, "takes from the strength")
	require.Contains(t, at(rows, bend(20)).Reason, "adds to the strength")
	require.Empty(t, at(rows, beam.Demand{Moment: units.KipFoot.Of(100)}).Steps[0].Note)
	require.Equal(t, "no bars lie at the tension face", at([]beam.Row{top(2, "#4")}, bend(0)).Reason)
	require.Equal(t, "nothing balances the section under the axial force", at([]beam.Row{bottom(1, "#9"), top(2, "#4")}, bend(-200)).Reason)

	r, _ := checkUS(t, ACI31819(), rows, nil, bend(0))
	require.Contains(t, find1(t, r, "flexure.negative").Reason, "at the top")
	cross := find1(t, r, "flexure.cross-check.positive")
	require.Equal(t, crossCheckMethod, cross.Reason)
	require.InDelta(t, 1e-6, cross.Capacity.SI(), 1e-12)
	r, _ = checkUS(t, ACI31819(), []beam.Row{bottom(2, "#4"), top(3, "#9")}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(-100)})
	require.Contains(t, find1(t, r, "flexure.positive").Reason, "at the bottom")

	// Of demands that bend in one sense the greatest moment is judged, and one
	// without a moment bends in none, whatever its axial force.
	c = at(rows, beam.Demand{Name: "a", Moment: units.KipFoot.Of(50)}, beam.Demand{Name: "b", Moment: units.KipFoot.Of(150)}, beam.Demand{Name: "c", Moment: units.KipFoot.Of(90)},
		beam.Demand{Name: "d", Axial: units.Kip.Of(-200), Shear: units.Kip.Of(1)})
	require.Equal(t, "b", c.Combination)
	require.Less(t, c.Utilization, 1.0)
}

// Demands that pull on both faces: of several the greatest share of each face is
// shown, with its name; a face without bars takes its share at its surface.
func TestSharesOfSeveralDemands(t *testing.T) {
	pull := func(name string, axial, moment float64) beam.Demand {
		return beam.Demand{Name: name, Axial: units.Kip.Of(-axial), Moment: units.KipFoot.Of(moment)}
	}
	rows := []beam.Row{bottom(3, "#9"), top(3, "#9")}
	r, trial := checkUS(t, ACI31819(), rows, nil, pull("low", 50, 30), pull("both", 60, 0), pull("high", 50, -30), pull("bending", 10, 100))
	shares := checksOf(r.Checks, "flexure.tension")
	require.Len(t, shares, 2)
	apart := 24 - 2*(1.5+0.375+0.564)
	for i, name := range []string{"low", "high"} {
		require.Equal(t, name, shares[i].Combination)
		require.InEpsilon(t, 25+30*12/apart, valueIn(t, shares[i].Demand, "kip"), 1e-9)
	}
	d := trial.EffectiveDepth(beam.Positive).In(units.Inch)
	r, _ = checkUS(t, ACI31819(), []beam.Row{bottom(1, "#9")}, nil, pull("1", 20, 0))
	shares = checksOf(r.Checks, "flexure.tension")
	require.InEpsilon(t, 20*12/d, valueIn(t, shares[0].Demand, "kip"), 1e-9)
	require.InEpsilon(t, 20-20*12/d, valueIn(t, shares[1].Demand, "kip"), 1e-9)
	require.Equal(t, beam.Fail, shares[1].Outcome)
	r, _ = checkUS(t, ACI31819(), []beam.Row{top(1, "#9")}, nil, pull("1", 20, 0))
	shares = checksOf(r.Checks, "flexure.tension")
	require.InEpsilon(t, 20*12/d, valueIn(t, shares[1].Demand, "kip"), 1e-9)
	require.Equal(t, beam.Fail, shares[0].Outcome)
	// However small the force.
	r, _ = checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Axial: units.PoundForce.Of(-0.5)})
	require.Len(t, checksOf(r.Checks, "flexure.tension"), 2)
	// And however small the moment that presses a face by it.
	r, _ = checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Axial: units.PoundForce.Of(-0.01), Moment: units.PoundInch.Of(0.5)})
	require.Empty(t, checksOf(r.Checks, "flexure.tension"))
	r, _ = checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Axial: units.PoundForce.Of(-0.01), Moment: units.PoundInch.Of(-0.5)})
	require.Empty(t, checksOf(r.Checks, "flexure.tension"))
}

// The lowest and the highest grade are met exactly, and a grade below the lowest
// names its own table.
func TestGradeAtItsBounds(t *testing.T) {
	for yield, want := range map[float64]beam.Outcome{40: beam.Pass, 100: beam.Pass} {
		row := bottom(3, "#8")
		row.Yield = units.KSI.Of(yield)
		r, _ := checkUS(t, ACI31819(), []beam.Row{row, top(2, "#4")}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
		c := find1(t, r, "flexure.grade")
		require.Equal(t, want, c.Outcome)
		require.Equal(t, "Table 20.2.2.4(a)", c.Clause)
	}
	row := bottom(3, "#8")
	row.Yield = units.KSI.Of(39)
	r, _ := checkUS(t, ACI31819(), []beam.Row{row, top(2, "#4")}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	require.Equal(t, "Table 20.2.1.3", find1(t, r, "flexure.grade").Clause)
	// One bar a side is held too.
	side := beam.Row{Mark: "W", Bar: "#5", Count: 1, Face: beam.Side, Spacing: in(9), Yield: units.KSI.Of(110)}
	r, _ = checkUS(t, ACI31819(), []beam.Row{bottom(3, "#8"), top(2, "#4"), side}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	require.Equal(t, beam.Side, find1(t, r, "flexure.grade").Face)
}

// d and ρw count layers in tension beyond two thirds of the depth, not one nearer
// the neutral axis; without any, every layer in tension.
func TestLayersOfTheTensionSide(t *testing.T) {
	at := func(depths ...float64) float64 {
		q := teeQuery()
		q.Section = rectangle(in(12), in(24))
		q.Layers = nil
		for _, d := range depths {
			q.Layers = append(q.Layers, layersAt([2]float64{1, d})...)
		}
		return flexureOf(t, ACI31819(), q).EffectiveDepth.In(units.Inch)
	}
	require.InEpsilon(t, 18.505, at(21, 16.01), 1e-12)
	require.InEpsilon(t, 18.55, at(21, 16.1), 1e-12)
	require.InEpsilon(t, 21, at(21, 15.99), 1e-12)
	require.InEpsilon(t, 12.95, at(15.9, 10), 1e-12)
}

// The law of a concrete is kept only for that concrete: of another strength with
// the same β1, or another β1, it is made anew.
func TestLawIsKeptForItsConcrete(t *testing.T) {
	e := ACI31819().e
	for _, pair := range [][2]float64{{3000, 4000}, {9000, 10000}, {5000, 5010}, {5000, 5001}} {
		kept, err := e.block(psi(pair[0]))
		require.NoError(t, err)
		law, err := e.reblock(kept, psi(pair[1]))
		require.NoError(t, err)
		require.Equal(t, psi(pair[1]).Scale(blockIntensity), law.Stress(crushing))
		same, err := e.reblock(law, psi(pair[1]))
		require.NoError(t, err)
		require.Equal(t, law, same)
	}
	_, err := e.reblock(mechanics.Law{}, psi(4000))
	require.NoError(t, err)
}
