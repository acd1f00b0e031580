package mechanics_test

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// A heavy top layer that the edge of the block passes just after the forces
// balance: taking the displaced concrete off upsets the balance, and the block
// must grow to restore it. Both depths follow from quadratics.
func TestTwoEquilibria(t *testing.T) {
	const width, dTop, d, aTop, area, yield = 300.0, 60.0, 540.0, 2000.0, 1476.0, 420.0
	const intensity, beta1 = 25.5, 0.85
	law := whitney(t, mpa(30), beta1)
	parts := mechanics.Rectangle(mm(width), mm(600))
	layers := []mechanics.Layer{layerSI(d, area, yield), layerSI(dTop, aTop, yield)}

	root := func(deducted float64) float64 {
		q, p, r := intensity*width*beta1, aTop*(600-deducted)-area*yield, aTop*600*dTop
		return (-p + math.Sqrt(p*p+4*q*r)) / (2 * q)
	}
	least, other := root(0), root(intensity)
	require.Less(t, beta1*least, dTop, "the case is what it says")
	require.Greater(t, beta1*other, dTop, "the case is what it says")

	for _, hogging := range []bool{false, true} {
		s, bending := mechanics.Section{Parts: parts, Layers: layers}, mechanics.Bending{}
		if hogging {
			s.Layers = []mechanics.Layer{layerSI(600-d, area, yield), layerSI(600-dTop, aTop, yield)}
			bending.Sense = mechanics.Hogging
		}
		u := solve(t, s, law, bending)
		require.Equal(t, 2, u.Equilibria)
		require.InEpsilon(t, least, u.NeutralAxis.In(units.Millimetre), 1e-12)
		require.Len(t, u.Others, 1)
		require.InEpsilon(t, other, u.Others[0].In(units.Millimetre), 1e-12)
		require.True(t, u.Layers[1].Displaced.IsZero())

		f, err := s.Fibres(law, bending)
		require.NoError(t, err)
		require.Equal(t, 2, f.Equilibria)
		require.InEpsilon(t, least, f.NeutralAxis.In(units.Millimetre), 1e-12)
		require.Len(t, f.Others, 1)
		require.InEpsilon(t, other, f.Others[0].In(units.Millimetre), 1e-12)

		bending.Displaced = mechanics.Ignore
		u = solve(t, s, law, bending)
		require.Equal(t, 1, u.Equilibria)
		require.InEpsilon(t, least, u.NeutralAxis.In(units.Millimetre), 1e-12)
	}
}

// Three layers close together, which the edge of the block passes one after the
// other, leave four upward crossings; found against a dense scan written here.
func TestFourEquilibria(t *testing.T) {
	const width, yield, tension, top = 150.0, 420.0, 224e3 / 420, 300.0
	law := whitney(t, mpa(30), 0.85)
	tops := []float64{40, 40.4, 40.8}
	s := mechanics.Section{Parts: mechanics.Rectangle(mm(width), mm(600)), Layers: []mechanics.Layer{layerSI(540, tension, yield)}}
	for _, d := range tops {
		s.Layers = append(s.Layers, layerSI(d, top, yield))
	}
	balance := func(c float64) float64 {
		sum := 25.5*width*0.85*c - tension*yield
		for _, d := range tops {
			f := math.Max(-yield, math.Min(yield, 600*(c-d)/c))
			if d < 0.85*c {
				f -= 25.5
			}
			sum += top * f
		}
		return sum
	}
	var want []float64
	const step = 1e-4
	for i := 100_000; i < 2_000_000; i++ {
		if c := float64(i) * step; balance(c-step) < 0 && balance(c) >= 0 {
			want = append(want, c)
		}
	}
	require.Len(t, want, 4, "the case is what it says")

	u := solve(t, s, law, mechanics.Bending{})
	f, err := s.Fibres(law, mechanics.Bending{})
	require.NoError(t, err)
	require.Equal(t, 4, u.Equilibria)
	require.Equal(t, 4, f.Equilibria)
	require.InDelta(t, want[0], u.NeutralAxis.In(units.Millimetre), step)
	require.InDelta(t, want[0], f.NeutralAxis.In(units.Millimetre), step)
	for i := range u.Others {
		require.InDelta(t, want[i+1], u.Others[i].In(units.Millimetre), step)
		require.InDelta(t, want[i+1], f.Others[i].In(units.Millimetre), step)
	}
}

// A bar exactly at the edge of the block, and a bar exactly at its yield strain:
// the borders of the search, met exactly.
func TestEquilibriumOnABorder(t *testing.T) {
	law := whitney(t, mpa(30), 0.8)
	// c = 100 mm, a = 80 mm, the top bar at 80 mm: strain 0.0006, 120 MPa.
	const compression = 25.5*300*80 + 1000*120
	t.Run("bar at the edge of the block", func(t *testing.T) {
		s := mechanics.Section{
			Parts:  mechanics.Rectangle(mm(300), mm(600)),
			Layers: []mechanics.Layer{layerSI(540, compression/400.0, 400), layerSI(80, 1000, 400)},
		}
		u := solve(t, s, law, mechanics.Bending{})
		require.InEpsilon(t, 100, u.NeutralAxis.In(units.Millimetre), 1e-9)
		require.InDelta(t, 0, u.Residual.In(units.Newton), 1e-3)
		require.True(t, u.Layers[1].Displaced.IsZero(), "the least depth is the one before the bar is inside")
	})
	t.Run("balanced steel", func(t *testing.T) {
		// Steel of 400 MPa yields at 0.002: c = 0.6·d = 300 mm, a = 240 mm.
		s := mechanics.Section{
			Parts:  mechanics.Rectangle(mm(300), mm(600)),
			Layers: []mechanics.Layer{layerSI(500, 25.5*300*240/400, 400)},
		}
		u := solve(t, s, law, mechanics.Bending{})
		require.Equal(t, 1, u.Equilibria)
		require.InEpsilon(t, 300, u.NeutralAxis.In(units.Millimetre), 1e-12)
		require.InEpsilon(t, 0.002, u.ExtremeStrain, 1e-12)
	})
	t.Run("block as deep as a flange", func(t *testing.T) {
		s := mechanics.Section{
			Parts:  mechanics.Tee(mm(800), mm(80), mm(300), mm(600)),
			Layers: []mechanics.Layer{layerSI(540, 25.5*800*80/400, 400)},
		}
		u := solve(t, s, law, mechanics.Bending{})
		require.Equal(t, 1, u.Equilibria)
		require.InEpsilon(t, 100, u.NeutralAxis.In(units.Millimetre), 1e-12)
	})
}

// A law that softens lets the force fall as the neutral axis goes down: in a
// section with a wide flange in compression and axial force, without any bar
// being passed.
func TestEquilibriaOfASofteningLaw(t *testing.T) {
	law, err := mechanics.Polyline(
		mechanics.Point{},
		mechanics.Point{Strain: 0.001, Stress: mpa(30)},
		mechanics.Point{Strain: 0.004, Stress: mpa(3)},
	)
	require.NoError(t, err)
	s := mechanics.Section{
		Parts:  mechanics.Tee(mm(1500), mm(150), mm(100), mm(700)),
		Layers: []mechanics.Layer{layerSI(640, 200, 500)},
	}
	bending := mechanics.Bending{Axial: units.Kilonewton.Of(1500)}
	u := solve(t, s, law, bending)
	f, err := s.Fibres(law, bending)
	require.NoError(t, err)
	require.Equal(t, 2, u.Equilibria)
	require.Equal(t, u.Equilibria, f.Equilibria)
	require.InEpsilon(t, f.NeutralAxis.In(units.Metre), u.NeutralAxis.In(units.Metre), 1e-9)
	for i := range u.Others {
		require.InEpsilon(t, f.Others[i].In(units.Metre), u.Others[i].In(units.Metre), 1e-9)
	}
}

func TestNoEquilibrium(t *testing.T) {
	law := whitney(t, ksi(4), 0.85)
	var none *mechanics.NoEquilibriumError
	plain := mechanics.Section{Parts: mechanics.Rectangle(in(12), in(20))}
	face := mechanics.Section{Parts: plain.Parts, Layers: []mechanics.Layer{layerUS(0, 1, 60)}}
	for name, s := range map[string]mechanics.Section{"no steel": plain, "steel at the compression face only": face} {
		t.Run(name, func(t *testing.T) {
			_, err := s.Ultimate(law, mechanics.Bending{})
			require.ErrorAs(t, err, &none)
			_, err = s.Fibres(law, mechanics.Bending{})
			require.ErrorAs(t, err, &none)
		})
	}
	require.EqualError(t, none, none.Error())
	// An axial force inside the limits makes a plain section balance.
	u := solve(t, plain, law, mechanics.Bending{Axial: units.Kip.Of(100)})
	require.InEpsilon(t, 100/(3.4*12), u.CompressionDepth.In(units.Inch), 1e-12)
	require.InEpsilon(t, 100*(10-100/(3.4*12)/2), u.Nominal.In(units.KipInch), 1e-12)
}
