package mechanics_test

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// requireSameStrength holds two sections against each other in both senses,
// with and without axial force.
func requireSameStrength(t *testing.T, a, b mechanics.Section, within float64) {
	t.Helper()
	law := whitney(t, mpa(30), 0.85)
	for _, sense := range []mechanics.Sense{mechanics.Sagging, mechanics.Hogging} {
		for _, axial := range []float64{0, 300} {
			bending := mechanics.Bending{Sense: sense, Axial: units.Kilonewton.Of(axial)}
			u, v := solve(t, a, law, bending), solve(t, b, law, bending)
			require.InEpsilon(t, u.NeutralAxis.In(units.Metre), v.NeutralAxis.In(units.Metre), within)
			require.InEpsilon(t, u.Nominal.In(units.NewtonMetre), v.Nominal.In(units.NewtonMetre), within)
			require.InEpsilon(t, u.Concrete.In(units.Newton), v.Concrete.In(units.Newton), within)
			require.InEpsilon(t, u.ConcreteDepth.In(units.Metre), v.ConcreteDepth.In(units.Metre), within)
			require.InDelta(t, u.ExtremeStrain, v.ExtremeStrain, within)
			require.Equal(t, u.Equilibria, v.Equilibria)
		}
		c, err := a.Cracked(8, sense)
		require.NoError(t, err)
		d, err := b.Cracked(8, sense)
		require.NoError(t, err)
		require.InEpsilon(t, c.NeutralAxis.In(units.Metre), d.NeutralAxis.In(units.Metre), within)
		require.InEpsilon(t, c.SecondMoment.In(units.Metre4), d.SecondMoment.In(units.Metre4), within)
	}
	g, err := a.Gross()
	require.NoError(t, err)
	h, err := b.Gross()
	require.NoError(t, err)
	require.InEpsilon(t, g.SecondMoment.In(units.Metre4), h.SecondMoment.In(units.Metre4), within)
	require.InEpsilon(t, g.Centroid.In(units.Metre), h.Centroid.In(units.Metre), within)
}

// A shape whose parts come to those of another is that other.
func TestLimitsOfShapes(t *testing.T) {
	const b, h = 400.0, 700.0
	layers := []mechanics.Layer{layerSI(60, 1500, 420), layerSI(350, 300, 500), layerSI(640, 2200, 420)}
	section := func(parts []mechanics.Part) mechanics.Section { return mechanics.Section{Parts: parts, Layers: layers} }
	rectangle := section(mechanics.Rectangle(mm(b), mm(h)))
	t.Run("flange as wide as the web", func(t *testing.T) {
		requireSameStrength(t, rectangle, section(mechanics.Tee(mm(b), mm(120), mm(b), mm(h))), exact)
		requireSameStrength(t, rectangle, section(mechanics.InvertedTee(mm(b), mm(120), mm(b), mm(h))), exact)
		requireSameStrength(t, rectangle, section(mechanics.Tee(mm(b*(1+1e-10)), mm(120), mm(b), mm(h))), 1e-9)
	})
	t.Run("flange nearly as deep as the section", func(t *testing.T) {
		requireSameStrength(t, rectangle, section(mechanics.Tee(mm(b), mm(h-0.1), mm(b*(1-1e-7)), mm(h))), 1e-9)
		requireSameStrength(t, rectangle, section(mechanics.InvertedTee(mm(b), mm(h-0.1), mm(b*(1-1e-7)), mm(h))), 1e-9)
		// A web of the least thickness below takes off what it must.
		requireSameStrength(t, rectangle, section(mechanics.Tee(mm(b), mm(h-0.1), mm(b/2), mm(h))), 2e-3)
	})
	t.Run("walls that meet", func(t *testing.T) {
		requireSameStrength(t, rectangle, section(mechanics.Box(mm(b), mm(h), mm(100), mm(150), mm(b))), exact)
	})
	t.Run("sides that come upright", func(t *testing.T) {
		requireSameStrength(t, rectangle, section(mechanics.Trapezoid(mm(b), mm(b), mm(h))), 0x1p-52)
		requireSameStrength(t, rectangle, section(mechanics.Trapezoid(mm(b), mm(b*(1+1e-10)), mm(h))), 1e-9)
		requireSameStrength(t, rectangle, section(mechanics.Trapezoid(mm(b*(1+1e-10)), mm(b), mm(h))), 1e-9)
	})
	t.Run("sides that come to a step", func(t *testing.T) {
		haunched := []mechanics.Part{
			{Bottom: mm(120), Width: mm(900)},
			{Top: mm(120), Bottom: mm(120.1), Width: mm(900), BottomWidth: mm(b)},
			{Top: mm(120.1), Bottom: mm(h), Width: mm(b)},
		}
		requireSameStrength(t, section(mechanics.Tee(mm(900), mm(120), mm(b), mm(h))), section(haunched), 5e-4)
	})
	t.Run("a layer that comes to nothing", func(t *testing.T) {
		trace := rectangle
		trace.Layers = append([]mechanics.Layer{layerSI(500, 1e-6, 420)}, layers...)
		requireSameStrength(t, rectangle, trace, 1e-8)
		tee := section(mechanics.Tee(mm(900), mm(120), mm(b), mm(h)))
		trace.Parts = tee.Parts
		requireSameStrength(t, tee, trace, 1e-8)
	})
}
