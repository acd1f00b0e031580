package bars_test

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/bars"
	"soffit.example/units"
)

// problem is a cage with its bars and clearances.
type problem struct {
	cage   bars.Cage
	layers []bars.Layer
	need   bars.Clearances
	radius float64 // inside, of the stirrup's bend, m
}

// drawProblem draws arrangements from the plain to the odd: one to three
// layers, up to three sizes in each, wide and hopelessly narrow forms.
func drawProblem(t *rapid.T) problem {
	catalogs := bars.Catalogs()
	c := rapid.SampledFrom(catalogs).Draw(t, "catalog")
	var p problem
	length := func(label string, low, high int) units.Length {
		return units.Millimetre.Of(float64(rapid.IntRange(low, high).Draw(t, label)))
	}
	p.cage = bars.Cage{
		Width: length("width", 50, 2500), SideCover: length("side cover", 0, 90), FaceCover: length("face cover", 0, 90),
		Corner: rapid.SampledFrom([]bars.Corner{bars.Seated, bars.Tucked}).Draw(t, "corner"),
	}
	if rapid.Bool().Draw(t, "has stirrup") {
		p.cage.Stirrup = c.At(rapid.IntRange(0, 1).Draw(t, "stirrup"))
		b, err := p.cage.Stirrup.Bend(bars.Stirrup)
		require.NoError(t, err)
		p.radius = b.Radius().In(units.Metre)
		if rapid.Bool().Draw(t, "own bend") {
			p.cage.BendRadius = length("bend radius", 1, 120)
			p.radius = p.cage.BendRadius.In(units.Metre)
		}
	}
	p.need = bars.Clearances{
		InLayer:       bars.Clearance{Least: length("clear", 0, 50), Diameters: float64(rapid.IntRange(0, 3).Draw(t, "diameters")) / 2},
		BetweenLayers: bars.Clearance{Least: length("vertical", 0, 50)},
	}
	for range rapid.IntRange(1, 3).Draw(t, "layers") {
		var l bars.Layer
		for range rapid.IntRange(1, 3).Draw(t, "groups") {
			s, err := bars.Bundle(c.At(rapid.IntRange(0, c.Len()-1).Draw(t, "size")), max(1, rapid.IntRange(-2, bars.MaxBundle).Draw(t, "bundled")))
			require.NoError(t, err)
			l = append(l, bars.Group{Size: s, Count: rapid.IntRange(1, 6).Draw(t, "count")})
		}
		p.layers = append(p.layers, l)
	}
	return p
}

func (p problem) fit(t require.TestingT) *bars.Fit {
	f, err := p.cage.Fit(p.layers, p.need)
	require.NoError(t, err)
	return f
}

// A form of the least width fits, one a little narrower does not, and the
// least width does not depend on the width it was found at.
func TestLeastWidthIsLeast(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		p := drawProblem(t)
		f := p.fit(t)
		require.Equal(t, f.LeastWidth.AtMost(p.cage.Width), f.Fits())

		p.cage.Width = f.LeastWidth
		at := p.fit(t)
		require.True(t, at.Fits())
		require.InEpsilon(t, f.LeastWidth.In(units.Metre), at.LeastWidth.In(units.Metre), 1e-10)

		p.cage.Width = f.LeastWidth.Scale(1 - 1e-6)
		require.False(t, p.fit(t).Fits())
		p.cage.Width = f.LeastWidth.Scale(3)
		require.True(t, p.fit(t).Fits())
	})
}

// Where Fits says yes, no two bars overlap and each lies inside the rounded
// inner face of the stirrup: measured here from the coordinates by brute
// force over all pairs of real bars.
func TestBarsThatFitAreApartAndInside(t *testing.T) {
	const slack = 1e-9 // m
	rapid.Check(t, func(t *rapid.T) {
		p := drawProblem(t)
		p.cage.Width = p.fit(t).LeastWidth.Scale(rapid.Float64Range(1, 2).Draw(t, "times least width"))
		f := p.fit(t)
		require.True(t, f.Fits())
		side := p.cage.SideCover.Add(p.cage.Stirrup.Diameter).In(units.Metre)
		base := p.cage.FaceCover.Add(p.cage.Stirrup.Diameter).In(units.Metre)
		var all []bars.Placed
		var of []int // the bar or bundle of f that each is part of
		for i := range f.Bars {
			all = f.Bars[i].AppendSingles(all)
			for len(of) < len(all) {
				of = append(of, i)
			}
		}
		require.Equal(t, all, f.AppendSingles(nil))
		for i := range all {
			xi, yi, ri := circle(all[i])
			for j := range i {
				xj, yj, rj := circle(all[j])
				clear := math.Hypot(xi-xj, yi-yj) - ri - rj
				required := p.need.BetweenLayers.Least.In(units.Metre)
				if all[i].Layer == all[j].Layer {
					thicker := f.Bars[of[i]].Size.Diameter.Max(f.Bars[of[j]].Size.Diameter)
					required = max(p.need.InLayer.Least.In(units.Metre), p.need.InLayer.Diameters*thicker.In(units.Metre))
				}
				if of[i] == of[j] || all[i].Layer-all[j].Layer > 1 {
					required = 0
				}
				require.GreaterOrEqual(t, clear, required-slack, "bars %d and %d", j, i)
			}
			u, v := min(xi, p.cage.Width.In(units.Metre)-xi)-side, yi-base
			require.GreaterOrEqual(t, u, ri-slack)
			require.GreaterOrEqual(t, v, ri-slack)
			if u < p.radius-slack && v < p.radius-slack && ri < p.radius {
				require.LessOrEqual(t, math.Hypot(p.radius-u, p.radius-v)+ri, p.radius+1e-7, "bar %d is in the bend", i)
			}
		}
	})
}

func circle(b bars.Placed) (x, y, r float64) {
	return b.X.In(units.Metre), b.Y.In(units.Metre), b.Size.Diameter.In(units.Metre) / 2
}

// Everything a fit reports is finite and agrees with its coordinates.
func TestFitIsConsistent(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		p := drawProblem(t)
		f := p.fit(t)
		requireConsistent(t, f, p.layers)

		odd, total := map[string]int{}, 0
		for _, g := range p.layers[0] {
			odd[g.Size.Name] += g.Count
			total += g.Count
		}
		oddSizes := 0
		for _, n := range odd {
			oddSizes += n % 2
		}
		require.Equal(t, total, f.Layers[0].Count)
		if oddSizes <= 1 && len(odd) == len(p.layers[0]) {
			require.True(t, f.Layers[0].Symmetric)
			for i := range (total + 1) / 2 {
				if i > 0 {
					require.False(t, f.Bars[i-1].Size.Diameter.Less(f.Bars[i].Size.Diameter) && i < total/2, "larger bars outermost")
				}
			}
		}
	})
}

func requireConsistent(t require.TestingT, f *bars.Fit, layers []bars.Layer) {
	var groups []bars.Group
	count := 0
	for _, l := range layers {
		groups = append(groups, l...)
	}
	for _, g := range groups {
		count += g.Count
	}
	require.Len(t, f.Bars, count)
	require.Len(t, f.Layers, len(layers))
	require.InEpsilon(t, bars.TotalArea(groups...).In(units.SquareMetre), f.Area.In(units.SquareMetre), 1e-12)
	require.True(t, f.LeastWidth.IsFinite() && f.Centroid.IsFinite() && f.Height.IsFinite())

	moment := 0.0
	for i := range f.Bars {
		x, y, r := circle(f.Bars[i])
		require.False(t, math.IsNaN(x+y) || math.IsInf(x+y, 0))
		if f.Bars[i].Size.Bundled() > 1 {
			_, _, away := f.Bars[i].Size.Extent()
			r = away.In(units.Metre)
		}
		require.False(t, f.Height.In(units.Metre) < y+r)
		moment += y * f.Bars[i].Size.Area.In(units.SquareMetre)
		require.True(t, f.EdgeDistance(i).IsFinite() && f.NeighbourDistance(i).IsFinite())
	}
	require.InEpsilon(t, moment, f.Area.In(units.SquareMetre)*f.Centroid.In(units.Metre), 1e-9)
	next := 0
	for i, l := range f.Layers {
		require.Equal(t, next, l.First)
		next += l.Count
		require.Equal(t, l.Count > 1, l.Beside.Exists())
		require.Equal(t, i > 0, l.Below.Exists())
		require.False(t, l.MoreThanBelow && l.Aligned && l.Beside.OK())
		require.False(t, l.Beside.Clear.Less(l.LeastClear))
		require.True(t, l.Spacing.IsFinite() && l.Cover.IsFinite() && l.Centroid.IsFinite())
		for j := l.First; j < next; j++ {
			require.Equal(t, i+1, f.Bars[j].Layer)
		}
	}
	require.Equal(t, len(f.Bars), next)
}

func FuzzLay(f *testing.F) {
	f.Add(0.4, 0.04, 0.04, 0.0, 0.0, 0.025, 1.0, 0.025, uint8(4), uint8(2), uint8(1), uint8(3), false, uint8(1))
	f.Add(0.1, 0.05, 0.0, 0.7, 0.05, 0.0, 0.0, 0.0, uint8(1), uint8(7), uint8(0), uint8(10), true, uint8(2))
	f.Add(math.Inf(1), math.NaN(), -1.0, 1e300, 1e-300, 0.0, 0.0, 0.0, uint8(0), uint8(0), uint8(0), uint8(0), true, uint8(3))
	f.Add(0.5, 0.04, 0.04, 0.6, 0.0, 0.025, 1.0, 0.025, uint8(2), uint8(2), uint8(5), uint8(3), true, uint8(3))
	f.Add(5e-324, 0.0, 0.0, 0.0, 0.0, 10.0, 100.0, 10.0, uint8(200), uint8(200), uint8(10), uint8(0), true, uint8(4))
	catalog, err := bars.Lookup("astm-inch")
	require.NoError(f, err)
	f.Fuzz(func(t *testing.T, width, side, face, depth, bend, least, diameters, vertical float64, n1, n2, s1, s2 uint8, tucked bool, bundled uint8) {
		cage := bars.Cage{
			Width: units.Metre.Of(width), Depth: units.Metre.Of(depth),
			SideCover: units.Metre.Of(side), FaceCover: units.Metre.Of(face),
			Stirrup: catalog.At(int(s1) % 3), BendRadius: units.Metre.Of(bend),
		}
		if tucked {
			cage.Corner = bars.Tucked
		}
		need := bars.Clearances{
			InLayer:       bars.Clearance{Least: units.Metre.Of(least), Diameters: diameters},
			BetweenLayers: bars.Clearance{Least: units.Metre.Of(vertical)},
		}
		big, small := catalog.At(int(s1)%catalog.Len()), catalog.At(int(s2)%catalog.Len())
		big, err := bars.Bundle(big, int(bundled))
		if bundled < 1 || bundled > bars.MaxBundle {
			require.ErrorContains(t, err, "bars: bundle is ")
			return
		}
		require.NoError(t, err)
		layers := []bars.Layer{{{Size: small, Count: int(n1)}, {Size: big, Count: 2}}, {{Size: big, Count: int(n2)}}}
		fit, err := cage.Fit(layers, need)
		if err != nil {
			require.Nil(t, fit)
			require.Contains(t, err.Error(), "bars: ")
			return
		}
		requireConsistent(t, fit, layers)
		most, err := cage.MostInLayer(big, need.InLayer)
		require.NoError(t, err)
		require.True(t, most >= 0 && most <= bars.MaxBars)
	})
}
