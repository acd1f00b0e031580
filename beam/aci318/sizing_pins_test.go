package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

func sizingOf(e *edition, parts []mechanics.Part, depth, extreme float64) sizing {
	return e.sizing(parts, beam.Positive, psi(4000), psi(60000), in(depth), in(extreme), false)
}

// The neutral axis for a moment is the one that gives it (22.2.2.4), in each
// strip of a section: straight, widening by as much as it is high, narrowing, and
// straight again to below the steel.
func TestAxisOfEachStrip(t *testing.T) {
	z := sizingOf(ACI31819().e, []mechanics.Part{
		{Bottom: in(3), Width: in(10)},
		{Top: in(3), Bottom: in(7), Width: in(10), BottomWidth: in(14)},
		{Top: in(7), Bottom: in(11), Width: in(14), BottomWidth: in(8)},
		{Top: in(11), Bottom: in(24), Width: in(8)},
	}, 21, 21)
	for _, block := range []float64{1, 2.9, 3.1, 5, 6.9, 7.1, 9, 10.9, 11.1, 15, 20} {
		axis := block / z.beta1
		require.InEpsilon(t, axis, z.axisFor(z.nominal(axis)), 1e-9, "a block of %v in.", block)
	}
	require.True(t, math.IsNaN(z.axisFor(1.001*z.nominal(21/z.beta1))))
}

// In a section that narrows all the way, and in one that widens by as much as it
// is high, the block reaches down to the steel and no further.
func TestAxisOfTheWholeStrip(t *testing.T) {
	for _, bottom := range []float64{8, 36} {
		z := sizingOf(ACI31819().e, []mechanics.Part{{Bottom: in(24), Width: in(12), BottomWidth: in(bottom)}}, 20, 20)
		_, x2, w1, w2 := z.strip(0)
		area, first := upper(20, w1, (w2-w1)/x2)
		whole := area*20 - first
		most := z.intensity() * whole
		require.Equal(t, whole, most/z.intensity(), "the very moment of the block down to the steel")
		require.InEpsilon(t, 20/z.beta1, z.axisFor(most), 1e-6)
		require.True(t, math.IsNaN(z.axisFor(1.001*most)))
	}
}

// The transition of 318-14, Table 21.2.2, is searched from the strain of tension
// control to the least strain of 9.3.3.1, both of which are in it. At these depths
// φMn rises throughout; with the centroid far above the extreme layer it has its
// peak at the first step.
func TestEndsOfTheTransition(t *testing.T) {
	e := ACI31814().e
	z := sizingOf(e, mechanics.Rectangle(in(14), in(24)), 22, 22)
	full, limit := 22*3.0/8, 22*3.0/7
	require.InEpsilon(t, limit, z.axisBetween(full, limit, z.design(limit)), 1e-9)
	require.True(t, math.IsNaN(z.axisBetween(full, limit, 1.0001*z.design(limit))))
	// No transition: the one place there is.
	require.Equal(t, full, z.axisBetween(full, full, z.design(full)))
	require.True(t, math.IsNaN(z.axisBetween(full, full, 1.001*z.design(full))))

	step := full + (limit-full)/64
	peaked := false
	for d := 12.0; d < 22 && !peaked; d += 0.005 {
		z = sizingOf(e, mechanics.Rectangle(in(14), in(24)), d, 22)
		z.depth = d
		at := func(x float64) float64 { return z.design(full + (limit-full)*x/64) }
		peaked = at(1) > at(0) && at(1) > at(2)
	}
	require.True(t, peaked)
	got := z.axisBetween(full, limit, z.design(step))
	require.Greater(t, got, full)
	require.LessOrEqual(t, got, step)
}

// The least steel over all centroids lies where the steel for strength is the
// least steel: of a rectangle As = k d with
// Mu/φ = k d fy (d - k d fy / (2 × 0.85 f'c b)).
func TestLeastSteelOverAllCentroids(t *testing.T) {
	const k = 200.0 / 60000 * 14
	for _, tc := range []struct{ depth, crossing float64 }{{22, 21}, {22, 18}, {0.9, 0.8}} {
		z := sizingOf(ACI31819().e, mechanics.Rectangle(in(14), in(24)), tc.depth, tc.depth)
		d := tc.crossing
		moment := 0.9 * k * d * 60000 * (d - k*d*60000/(2*3400*14))
		require.InEpsilon(t, k*d, z.leastArea(moment, k, 4.0/3), 1e-9, "%v", tc)
	}
}

// Compression steel of a doubly reinforced section at the edges of its formula:
// at the foot of the block it displaces concrete, at the neutral axis it is of no
// use, and just above it is; it is not needed where concrete carries all.
func TestCompressionSteelAtItsEdges(t *testing.T) {
	z := sizingOf(ACI31819().e, mechanics.Rectangle(in(14), in(24.5)), 22, 22)
	const modulus = 29e6
	plain := z.both(7.2e6, 2, modulus, false)
	require.True(t, plain.ok)
	foot := z.both(7.2e6, plain.block, modulus, false)
	stress := modulus * 0.003 * (1 - plain.block/plain.axis)
	require.InEpsilon(t, plain.rest/((stress-3400)*(22-plain.block)), foot.pressure, 1e-9)
	require.False(t, z.both(7.2e6, plain.axis, modulus, false).ok)
	near := z.both(7.2e6, plain.axis*(1-0.5/87000), modulus, false)
	require.True(t, near.ok)
	require.InDelta(t, 0.5, near.stress, 1e-6)

	require.True(t, z.both(z.reduction.tension*(plain.alone+0.5), 2, modulus, false).ok)
	exact := z
	for fc := 4000.0; ; fc++ {
		exact.fc = fc
		b := exact.both(exact.reduction.tension*exact.nominal(plain.axis), 2, modulus, false)
		if b.rest == 0 {
			require.False(t, b.ok)
			break
		}
		require.Less(t, fc, 4100.0, "one of them leaves nothing")
	}

	// Steel that just yields does yield.
	top := plain.axis * (1 - 60000/(modulus*0.003))
	require.True(t, z.both(7.2e6, top, modulus, false).yields)
	require.False(t, z.both(7.2e6, top+1e-6, modulus, false).yields)
}

// Steel put back that does not give the moment is told, with the nominal moment
// asked for.
func TestSteelPutBackThatDoesNotFit(t *testing.T) {
	e := ACI31819().e
	q := SteelQuery{Section: rectangle(in(14), in(24)), Bending: beam.Positive, Depth: in(22), Extreme: in(22), Strength: psi(4000), Yield: psi(60000), Moment: units.KipFoot.Of(180)}
	r := RequiredSteel{Tension: in2(1), NeutralAxis: in(2), Phi: 0.9}
	var fault *DisagreementError
	require.ErrorAs(t, e.putBack(&q, mechanics.Rectangle(in(14), in(24)), &r), &fault)
	require.InEpsilon(t, 200, fault.Nominal.In(units.KipFoot), 1e-12)
	require.InEpsilon(t, 60*(22-60/(2*3.4*14)), fault.Other.In(units.KipInch), 1e-9)
}

// With compression steel at the foot of the block a lesser depth, at which it
// displaces nothing, balances the section too: the steel is given all the same.
func TestSteelWithAnotherEquilibrium(t *testing.T) {
	s, err := ACI31819().RequiredSteel(SteelQuery{
		Section: rectangle(in(14), in(24.5)), Depth: in(22), Top: in(6.9), Strength: psi(4000), Yield: psi(60000), Moment: units.KipFoot.Of(600),
	})
	require.NoError(t, err)
	require.Equal(t, 2, s.Equilibria)
}

// A force of one pound and moments of one pound-inch count like any (22.4.1).
func TestSmallForcesCount(t *testing.T) {
	_, trial := checkUS(t, ACI31819(), []beam.Row{bottom(3, "#9"), top(3, "#9")}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	e := ACI31819().e
	z := e.trialSizing(trial, beam.Positive)
	arm := z.depth - 12
	steel := func(moment, axial float64) float64 {
		area, ok := z.tensionWith(e, trial, beam.Positive, moment, axial)
		require.True(t, ok)
		return area
	}
	require.InEpsilon(t, z.tension(1000+arm).area-1/(0.9*60000), steel(1000, 1), 1e-9)
	require.InEpsilon(t, z.tension(1).area, steel(1, 0), 1e-9)
	require.Zero(t, steel(0, 0))
	gross, first := z.concrete(z.height)
	require.InEpsilon(t, 1.0, steel(54000*(z.depth-first/gross), -54000), 1e-12, "no moment about the steel: the force alone")
	require.InEpsilon(t, 1+0.5/(0.9*60000*z.depth), steel(54000*(z.depth-first/gross)+0.5, -54000), 1e-9)

	// What no steel carries, no axial tension makes it carry (9.5.2.1), and no
	// area is given.
	most := z.design(z.axisAt(z.reduction.tensionStrain(z.yieldStrain)))
	area, ok := z.steel(e, trial, beam.Positive, 1.001*most, -50000)
	require.False(t, ok)
	require.Zero(t, area)
}

// The most that tension steel carries beside compression steel is at the strain
// of tension control, and carries it; beyond, none is given.
func TestMostBesideCompressionSteel(t *testing.T) {
	relied := top(3, "#9")
	relied.InCompression = true
	_, trial := checkUS(t, ACI31819(), []beam.Row{bottom(4, "#9"), relied}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	e := ACI31819().e
	z := e.trialSizing(trial, beam.Positive)
	axis := z.axisAt(z.reduction.tensionStrain(z.yieldStrain))
	force, about := z.pressed(e, trial, beam.Positive, axis)
	most := 0.9 * (z.nominal(axis) + about)
	area, ok := z.tensionAndPressed(e, trial, beam.Positive, most, 0)
	require.True(t, ok)
	concrete, _ := z.concrete(z.beta1 * axis)
	require.InEpsilon(t, (3400*concrete+force)/60000, area, 1e-9)
	area, ok = z.tensionAndPressed(e, trial, beam.Positive, 1.001*most, 0)
	require.False(t, ok)
	require.Zero(t, area)

	// Bars at the foot of the block displace concrete.
	at := e.lengthIn(trial.Top.Rows[0].Height)
	foot := at / z.beta1
	require.Equal(t, at, z.beta1*foot)
	force, _ = z.pressed(e, trial, beam.Positive, foot)
	stress := e.materials.steelModulus * 0.003 * (foot - at) / foot
	require.InEpsilon(t, 3*(stress-3400), force, 1e-9)
}
