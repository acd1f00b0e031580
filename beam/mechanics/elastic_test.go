package mechanics_test

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

func TestGrossRectangle(t *testing.T) {
	s := mechanics.Section{Parts: mechanics.Rectangle(mm(300), mm(500)), Layers: []mechanics.Layer{layerSI(450, 1000, 420)}}
	p, err := s.Gross()
	require.NoError(t, err)
	require.InEpsilon(t, 150000, p.Area.In(units.SquareMillimetre), exact)
	require.InEpsilon(t, 250, p.Centroid.In(units.Millimetre), exact)
	require.InEpsilon(t, 300*math.Pow(500, 3)/12, p.SecondMoment.In(units.Millimetre4), exact)
	require.InEpsilon(t, 250, p.ToTop.In(units.Millimetre), exact)
	require.InEpsilon(t, 250, p.ToBottom.In(units.Millimetre), exact)
}

// Steiner's theorem over the parts, written out.
func TestUncrackedTee(t *testing.T) {
	const bf, hf, bw, h, d, area, n = 800.0, 120.0, 300.0, 600.0, 540.0, 2000.0, 7.5
	s := mechanics.Section{Parts: mechanics.Tee(mm(bf), mm(hf), mm(bw), mm(h)), Layers: []mechanics.Layer{layerSI(d, area, 420)}}
	p, err := s.Uncracked(n)
	require.NoError(t, err)
	a1, a2, a3 := bf*hf, bw*(h-hf), (n-1)*area
	y1, y2 := hf/2, (h+hf)/2
	sum := a1 + a2 + a3
	y := (a1*y1 + a2*y2 + a3*d) / sum
	second := bf*hf*hf*hf/12 + a1*(y-y1)*(y-y1) + bw*math.Pow(h-hf, 3)/12 + a2*(y-y2)*(y-y2) + a3*(y-d)*(y-d)
	require.InEpsilon(t, sum, p.Area.In(units.SquareMillimetre), exact)
	require.InEpsilon(t, y, p.Centroid.In(units.Millimetre), exact)
	require.InEpsilon(t, second, p.SecondMoment.In(units.Millimetre4), exact)
	require.InEpsilon(t, h-y, p.ToBottom.In(units.Millimetre), exact)
}

func TestCrackedRectangle(t *testing.T) {
	const b, d, h, n = 300.0, 485.0, 550.0, 8.0
	for _, area := range []float64{100, 1530, 6000} {
		s := mechanics.Section{Parts: mechanics.Rectangle(mm(b), mm(h)), Layers: []mechanics.Layer{layerSI(d, area, 420)}}
		c, err := s.Cracked(n, mechanics.Sagging)
		require.NoError(t, err)
		// k = √(2ρn + (ρn)²) - ρn, in any textbook.
		rn := n * area / (b * d)
		k := math.Sqrt(2*rn+rn*rn) - rn
		second := b*math.Pow(k*d, 3)/3 + n*area*math.Pow(d-k*d, 2)
		require.InEpsilon(t, k*d, c.NeutralAxis.In(units.Millimetre), exact)
		require.InEpsilon(t, second, c.SecondMoment.In(units.Millimetre4), exact)
		// fs = M/(As·j·d), fc = 2M/(k·j·b·d²).
		moment := units.KilonewtonMetre.Of(90)
		j := 1 - k/3
		require.InEpsilon(t, 90e6/(area*j*d), c.SteelStress(moment, mm(d)).In(units.Megapascal), exact)
		require.InEpsilon(t, 2*90e6/(k*j*b*d*d), c.ConcreteStress(moment).In(units.Megapascal), exact)
	}
}

func TestCrackedDoublyAndHogging(t *testing.T) {
	const b, d, h, dTop, area, aTop, n = 300.0, 540.0, 600.0, 50.0, 3000.0, 1200.0, 9.0
	// b·x²/2 + (n-1)A's(x - d') = n·As(d - x)
	p, q := (n-1)*aTop+n*area, (n-1)*aTop*dTop+n*area*d
	x := (-p + math.Sqrt(p*p+2*b*q)) / b
	require.Greater(t, x, dTop)
	second := b*x*x*x/3 + (n-1)*aTop*(x-dTop)*(x-dTop) + n*area*(d-x)*(d-x)

	sagging := mechanics.Section{Parts: mechanics.Rectangle(mm(b), mm(h)), Layers: []mechanics.Layer{layerSI(d, area, 420), layerSI(dTop, aTop, 420)}}
	hogging := mechanics.Section{Parts: mechanics.Rectangle(mm(b), mm(h)), Layers: []mechanics.Layer{layerSI(h-dTop, aTop, 420), layerSI(h-d, area, 420)}}
	up, err := sagging.Cracked(n, mechanics.Sagging)
	require.NoError(t, err)
	down, err := hogging.Cracked(n, mechanics.Hogging)
	require.NoError(t, err)
	for _, c := range []mechanics.Cracked{up, down} {
		require.InEpsilon(t, x, c.NeutralAxis.In(units.Millimetre), exact)
		require.InEpsilon(t, second, c.SecondMoment.In(units.Millimetre4), exact)
	}
	m := units.KilonewtonMetre.Of(200)
	require.InEpsilon(t, n*200e6*(d-x)/second, up.SteelStress(m, mm(d)).In(units.Megapascal), exact)
	require.InEpsilon(t, n*200e6*(d-x)/second, down.SteelStress(m, mm(h-d)).In(units.Megapascal), exact)
	require.InEpsilon(t, n*200e6*(dTop-x)/second, down.SteelStress(m, mm(h-dTop)).In(units.Megapascal), exact)
}

// A neutral axis below the flange: the first moment is a quadratic of the web.
func TestCrackedTeeBelowFlange(t *testing.T) {
	const bf, hf, bw, h, d, area, n = 700.0, 80.0, 250.0, 650.0, 590.0, 5000.0, 8.0
	s := mechanics.Section{Parts: mechanics.Tee(mm(bf), mm(hf), mm(bw), mm(h)), Layers: []mechanics.Layer{layerSI(d, area, 420)}}
	c, err := s.Cracked(n, mechanics.Sagging)
	require.NoError(t, err)
	// bw·x²/2 + (bf - bw)·hf·(x - hf/2) = n·As·(d - x)
	p, q := (bf-bw)*hf+n*area, (bf-bw)*hf*hf/2+n*area*d
	x := (-p + math.Sqrt(p*p+2*bw*q)) / bw
	require.Greater(t, x, hf)
	second := bf*x*x*x/3 - (bf-bw)*math.Pow(x-hf, 3)/3 + n*area*(d-x)*(d-x)
	require.InEpsilon(t, x, c.NeutralAxis.In(units.Millimetre), exact)
	require.InEpsilon(t, second, c.SecondMoment.In(units.Millimetre4), exact)
}

func TestCrackedNeedsTensionSteel(t *testing.T) {
	var input *mechanics.InputError
	for _, layers := range [][]mechanics.Layer{nil, {layerSI(0, 500, 420)}} {
		_, err := mechanics.Section{Parts: mechanics.Rectangle(mm(300), mm(500)), Layers: layers}.Cracked(8, mechanics.Sagging)
		require.ErrorAs(t, err, &input)
		require.Equal(t, "layers", input.Field)
	}
}
