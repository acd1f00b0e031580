package mechanics_test

import (
	"fmt"
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// dyadic is an ultimate strain that divides without rounding.
const dyadic = 1.0 / 64

// stairs returns the law of n straight pieces between stresses of 1, 3, 6, 10...
// Pa at even strains, the first at none.
func stairs(t *testing.T, n int) mechanics.Law {
	t.Helper()
	points := make([]mechanics.Point, n+1)
	for i := range points {
		points[i] = mechanics.Point{Strain: dyadic * float64(i) / float64(n), Stress: units.Pascal.Of(float64((i + 1) * (i + 2) / 2))}
	}
	law, err := mechanics.Polyline(points...)
	require.NoError(t, err)
	return law
}

// Between the points of a polyline its stress is the mean in proportion, and at
// them it is theirs, however many pieces are searched.
func TestStressOfManyPieces(t *testing.T) {
	for _, n := range []int{1, 2, 4, 8, 16, 32} {
		t.Run(fmt.Sprint(n), func(t *testing.T) {
			law := stairs(t, n)
			require.Equal(t, dyadic, law.Ultimate())
			require.Len(t, law.Kinks(), n)
			for i := range n {
				from := dyadic * float64(i) / float64(n)
				low, high := float64((i+1)*(i+2)/2), float64((i+2)*(i+3)/2)
				require.Equal(t, from, law.Kinks()[i])
				require.Equal(t, low, law.Stress(from).In(units.Pascal))
				require.Equal(t, (3*low+high)/4, law.Stress(from+dyadic/float64(4*n)).In(units.Pascal))
				require.Equal(t, (low+high)/2, law.Stress(from+dyadic/float64(2*n)).In(units.Pascal))
			}
		})
	}
	// The trapezoids added up, and their moments about the greatest strain.
	mean, depth := stairs(t, 2).Resultant() // 1, 3, 6
	require.InEpsilon(t, (2+4.5)/2, mean.In(units.Pascal), exact)
	require.InEpsilon(t, (0.5*(1*0.75+2.0/2*(0.5+0.5/3))+0.5*(3*0.25+3.0/2*0.5/3))/(6.5/2), depth, exact)
}

// Stress starts at the first kink itself, and ends a billionth beyond the ultimate
// strain.
func TestEndsOfALaw(t *testing.T) {
	block, err := mechanics.RectangularBlock(units.Pascal.Of(8), 0.75, dyadic)
	require.NoError(t, err)
	for _, law := range []mechanics.Law{block, stairs(t, 1), stairs(t, 16)} {
		first, last := law.Kinks()[0], law.Stress(dyadic).In(units.Pascal)
		require.Positive(t, last)
		require.Positive(t, law.Stress(first).In(units.Pascal))
		require.Zero(t, law.Stress(math.Nextafter(first, -1)).In(units.Pascal))
		require.Zero(t, law.Stress(-dyadic).In(units.Pascal))
		require.InEpsilon(t, last, law.Stress(dyadic*(1+1e-9)).In(units.Pascal), 1e-7)
		require.Zero(t, law.Stress(dyadic*(1+1.0001e-9)).In(units.Pascal))
		require.Zero(t, law.Stress(math.NaN()).In(units.Pascal))
	}
	require.Equal(t, dyadic/4, block.Kinks()[0])
	require.Equal(t, 8.0, block.Stress(dyadic/4).In(units.Pascal))

	var zero mechanics.Law
	require.Zero(t, zero.Stress(0.001).In(units.Pascal))
	require.Zero(t, zero.Ultimate())
	require.Empty(t, zero.Kinks())
	mean, depth := zero.Resultant()
	require.Zero(t, mean.In(units.Pascal))
	require.Zero(t, depth)
}

// A jump belongs to the greater strains also in a law of many pieces.
func TestJumpsAmongManyPieces(t *testing.T) {
	law, err := mechanics.Curve(func(e float64) units.Stress {
		if s := e / dyadic; s < 0.5 {
			return mpa(10 * math.Sqrt(0.01+s))
		}
		return mpa(3)
	}, dyadic, dyadic/2)
	require.NoError(t, err)
	require.Greater(t, len(law.Kinks()), 9)
	require.InEpsilon(t, 3, law.Stress(dyadic/2).In(units.Megapascal), 1e-9)
	require.InEpsilon(t, 10*math.Sqrt(0.51), law.Stress(dyadic/2*(1-1e-12)).In(units.Megapascal), 1e-8)
	for i := range 64 {
		s := (float64(i) + 0.5) / 128
		require.InDelta(t, 10*math.Sqrt(0.01+s), law.Stress(s*dyadic).In(units.Megapascal), 2e-8)
	}
}

// A law as weak as may be is whole when cut; one whose mean falls below is not.
func TestWeakestTruncatedLaw(t *testing.T) {
	one := mechanics.Point{Stress: units.Pascal.Of(1)}
	flat, err := mechanics.Polyline(one, mechanics.Point{Strain: dyadic, Stress: one.Stress})
	require.NoError(t, err)
	mean, depth := flat.Resultant()
	require.Equal(t, 1.0, mean.In(units.Pascal))
	require.Equal(t, 0.5, depth)
	half, err := flat.Truncated(dyadic / 2)
	require.NoError(t, err)
	require.Equal(t, dyadic/2, half.Ultimate())
	require.Equal(t, 1.0, half.Stress(dyadic/4).In(units.Pascal))
	falling, err := mechanics.Polyline(one, mechanics.Point{Strain: dyadic})
	require.NoError(t, err)
	require.Equal(t, &mechanics.InputError{Field: "strain", Value: fmt.Sprint(dyadic), Allowed: "beyond where the law's stress begins"},
		discard(falling.Truncated(dyadic)))
}

// A piece is left out where less than a billionth of the strain lies in it.
func TestThinnestTruncatedPiece(t *testing.T) {
	law := stairs(t, 4)
	for _, test := range []struct {
		beyond float64
		pieces int
	}{{-1e-3, 2}, {0, 2}, {0.9e-9, 2}, {1.1e-9, 3}, {3e-9, 3}, {1e-3, 3}} {
		cut, err := law.Truncated(dyadic / 2 * (1 + test.beyond))
		require.NoError(t, err)
		require.Len(t, cut.Kinks(), test.pieces, "%v", test.beyond)
	}
	// The pieces left are the law's own, also of a cubic.
	curve, err := mechanics.Curve(func(e float64) units.Stress {
		s := e / dyadic
		return units.Pascal.Of(1000 * (1 + s + 2*s*s + 3*s*s*s))
	}, dyadic)
	require.NoError(t, err)
	cut, err := curve.Truncated(dyadic / 2)
	require.NoError(t, err)
	for i := range 33 {
		s := float64(i) / 64
		require.InEpsilon(t, 1000*(1+s+2*s*s+3*s*s*s), curve.Stress(s*dyadic).In(units.Pascal), 1e-12)
		require.InEpsilon(t, 1000*(1+s+2*s*s+3*s*s*s), cut.Stress(s*dyadic).In(units.Pascal), 1e-12)
	}
	mean, depth := cut.Resultant() // over 0 to 1/2
	force := 0.5 + 1.0/8 + 2.0/24 + 3.0/64
	first := 0.5*force - (1.0/8 + 1.0/24 + 2.0/64 + 3.0/160)
	require.InEpsilon(t, 1000*force/0.5, mean.In(units.Pascal), 1e-12)
	require.InEpsilon(t, first/force/0.5, depth, 1e-12)
}

// The limits that an axial force may not pass, by hand: without curvature all is
// at the ultimate strain; without depth all steel but that in the compression face
// is in tension. The fibres come as near as their least and greatest depth.
func TestLimitsOfAxialForce(t *testing.T) {
	softening, err := mechanics.Polyline(mechanics.Point{}, mechanics.Point{Strain: 0.001, Stress: mpa(30)}, mechanics.Point{Strain: 0.004, Stress: mpa(3)})
	require.NoError(t, err)
	block := whitney(t, mpa(30), 0.85)
	steel := []mechanics.Layer{layerSI(0, 500, 420), layerSI(300, 700, 500), layerSI(600, 900, 1000)}
	tapering := []mechanics.Part{{Bottom: mm(200), Width: mm(500), BottomWidth: mm(300)}, {Top: mm(200), Bottom: mm(600), Width: mm(300), BottomWidth: mm(400)}}
	const gross = 400*200 + 350*400.0
	for _, test := range []struct {
		name        string
		parts       []mechanics.Part
		layers      []mechanics.Layer
		law         mechanics.Law
		bending     mechanics.Bending
		least, most float64 // N
	}{
		{"plain", mechanics.Rectangle(mm(300), mm(600)), nil, block, mechanics.Bending{}, 0, 25.5 * 300 * 600},
		{"plain, softening", mechanics.Rectangle(mm(300), mm(600)), nil, softening, mechanics.Bending{}, 0, 3 * 300 * 600},
		{"plain, tapering", tapering, nil, block, mechanics.Bending{Sense: mechanics.Hogging}, 0, 25.5 * gross},
		// 1000 MPa is beyond 0.003 times 200 GPa.
		{"steel in sagging", tapering, steel, block, mechanics.Bending{}, 500*(420-25.5) - 700*500 - 900*1000, 25.5*(gross-2100) + 500*420 + 700*500 + 900*600},
		{"steel in hogging", tapering, steel, block, mechanics.Bending{Sense: mechanics.Hogging}, 900*(600-25.5) - 700*500 - 500*420, 25.5*(gross-2100) + 500*420 + 700*500 + 900*600},
		{"concrete behind steel ignored", tapering, steel, block, mechanics.Bending{Displaced: mechanics.Ignore}, 500*420 - 700*500 - 900*1000, 25.5*gross + 500*420 + 700*500 + 900*600},
	} {
		t.Run(test.name, func(t *testing.T) {
			s := mechanics.Section{Parts: test.parts, Layers: test.layers}
			for _, axial := range []float64{test.least - 10, 25e6} {
				test.bending.Axial = units.Newton.Of(axial)
				var none, byFibres *mechanics.NoEquilibriumError
				require.ErrorAs(t, discard(s.Ultimate(test.law, test.bending)), &none)
				require.Equal(t, test.bending.Sense, none.Sense)
				require.Equal(t, test.bending.Axial, none.Axial)
				require.InDelta(t, test.least, none.Least.In(units.Newton), 1e-6)
				require.InEpsilon(t, test.most, none.Most.In(units.Newton), exact)
				require.EqualError(t, none, fmt.Sprintf("no equilibrium in %v: an axial force of %v (compression positive) is not between %v and %v, the limits of the section",
					test.bending.Sense, none.Axial, none.Least, none.Most))
				require.ErrorAs(t, discard(s.Fibres(test.law, test.bending)), &byFibres)
				require.Equal(t, test.bending.Sense, byFibres.Sense)
				require.Equal(t, test.bending.Axial, byFibres.Axial)
				require.InDelta(t, test.least, byFibres.Least.In(units.Newton), 1e-4)
				require.InEpsilon(t, test.most, byFibres.Most.In(units.Newton), 2e-8)
			}
			for _, axial := range []float64{test.least + 10, test.most - 10} {
				test.bending.Axial = units.Newton.Of(axial)
				u := solve(t, s, test.law, test.bending)
				f, err := s.Fibres(test.law, test.bending)
				require.NoError(t, err)
				require.InEpsilon(t, f.NeutralAxis.In(units.Metre), u.NeutralAxis.In(units.Metre), 1e-6)
			}
		})
	}
}
