package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// loadedProblem is a beam of two spans of 10 m, 1 m deep and without weight,
// with only what the search for concentrated loads looks at.
func loadedProblem(loads ...beam.Load) *beam.Problem {
	p := &beam.Problem{}
	p.Brief.Spans = []units.Length{units.Metre.Of(10), units.Metre.Of(10)}
	p.Brief.Section.Depth = units.Metre.Of(1)
	p.Brief.Loads = loads
	return p
}

func pointOf(newtons, at float64) beam.Load {
	return beam.Load{Case: beam.Live, Shape: beam.PointLoad, Span: 1, Force: units.Newton.Of(newtons), At: units.Metre.Of(at)}
}

func stripOf(from, to, w, wEnd float64) beam.Load {
	return beam.Load{
		Case: beam.Live, Shape: beam.Partial, Span: 1, Varies: true, Intensity: units.NewtonPerMetre.Of(w), IntensityEnd: units.NewtonPerMetre.Of(wEnd),
		From: units.Metre.Of(from), To: units.Metre.Of(to),
	}
}

// A load counts from a hundredth of all that its span carries, which is added up
// from weight and loads of every shape by magnitude. Common practice, no source.
func TestNegligibleShareOfASpan(t *testing.T) {
	uniform := beam.Load{Shape: beam.Uniform, Span: 1, Intensity: units.NewtonPerMetre.Of(-99)}
	for _, c := range []struct {
		name   string
		weight float64
		other  beam.Load
	}{
		{"weight", 99, beam.Load{}},
		{"uniform load upward", 0, uniform},
		{"hung point load", 0, beam.Load{Shape: beam.PointLoad, Span: 1, Force: units.Newton.Of(-990), Hung: true}},
		{"strip", 0, stripOf(0, 9.9, 100, 100)},
		{"strip upward", 0, stripOf(0, 9.9, 0, -200)},
		{"every span's", 0, beam.Load{Shape: beam.Uniform, Intensity: units.NewtonPerMetre.Of(99)}},
	} {
		t.Run(c.name, func(t *testing.T) {
			// 990 N and the load P itself: P is more than a hundredth of all
			// above 10 N.
			for _, b := range []struct {
				force float64
				found int
			}{{9.99, 0}, {-9.99, 0}, {10.05, 1}, {-10.05, 1}} {
				p := loadedProblem(pointOf(b.force, 5), c.other)
				p.SelfWeight = units.NewtonPerMetre.Of(c.weight)
				var points []patch
				for _, l := range concentratedLoads(p, 1) {
					if l.load == 1 {
						points = append(points, l)
					}
				}
				require.Len(t, points, b.found, b.force)
			}
		})
	}
	require.Len(t, concentratedLoads(loadedProblem(pointOf(1, 5), pointOf(99, 6)), 1), 1, "just a hundredth is not more")
	elsewhere := pointOf(1e6, 5)
	elsewhere.Span = 2
	require.Len(t, concentratedLoads(loadedProblem(pointOf(1, 5), elsewhere), 1), 1, "what another span carries is of no account")
	require.Equal(t, []patch{{2, units.Metre.Of(5), units.Metre.Of(5)}}, concentratedLoads(loadedProblem(pointOf(1, 5), elsewhere), 2))
}

// Loads are named by their place in the brief, counted from one.
func TestConcentratedLoadsByNumber(t *testing.T) {
	hung := stripOf(4, 4.5, 100, 100)
	hung.Hung = true
	p := loadedProblem(stripOf(2, 2.5, 100, 100), hung, pointOf(100, 7), beam.Load{Shape: beam.Torque, Span: 1}, stripOf(8, 8.5, 100, 100))
	var got []int
	for _, l := range concentratedLoads(p, 1) {
		got = append(got, l.load)
	}
	require.ElementsMatch(t, []int{1, 3, 5}, got)
}

// Strips of one case that abut are one load in whatever order they are typed;
// strips apart, of another case, or of nothing are not part of it.
func TestAbuttingStripsAreOneLoad(t *testing.T) {
	snow := stripOf(5.2, 5.4, 100, 100)
	snow.Case = beam.Snow
	gap := func(share float64) float64 { return 5.2 + share*1e-9*10 }
	for _, c := range []struct {
		name  string
		loads []beam.Load
		want  []patch // in m
	}{
		{"typed in order", []beam.Load{stripOf(5, 5.2, 100, 100), stripOf(5.2, 5.4, 100, 100)}, []patch{meters(1, 5, 5.4)}},
		{"typed backwards", []beam.Load{stripOf(5.2, 5.4, 100, 100), stripOf(5, 5.2, 100, 100)}, []patch{meters(2, 5, 5.4)}},
		{"one inside the other", []beam.Load{stripOf(5, 5.4, 100, 100), stripOf(5.1, 5.2, 100, 100), stripOf(5.4, 5.6, 100, 100)}, []patch{meters(1, 5, 5.6)}},
		{"apart", []beam.Load{stripOf(5, 5.2, 100, 100), stripOf(5.3, 5.4, 100, 100)}, []patch{meters(1, 5, 5.2), meters(2, 5.3, 5.4)}},
		{"of two cases", []beam.Load{stripOf(5, 5.2, 100, 100), snow}, []patch{meters(1, 5, 5.2), meters(2, 5.2, 5.4)}},
		{"apart by what is rounding", []beam.Load{stripOf(5, 5.2, 100, 100), stripOf(gap(0.5), 5.4, 100, 100)}, []patch{meters(1, 5, 5.4)}},
		{"apart by just what is rounding", []beam.Load{stripOf(5, 5.2, 100, 100), stripOf(gap(1), 5.4, 100, 100)}, []patch{meters(1, 5, 5.4)}},
		{"apart by more than rounding", []beam.Load{stripOf(5, 5.2, 100, 100), stripOf(gap(5), 5.4, 100, 100)}, []patch{meters(1, 5, 5.2), meters(2, gap(5), 5.4)}},
		{"after one of nothing", []beam.Load{stripOf(4.8, 5, 0, 0), stripOf(5, 5.2, 100, 100)}, []patch{meters(2, 5, 5.2)}},
		{"next to nothing", []beam.Load{stripOf(5, 5.2, 1, 1)}, []patch{meters(1, 5, 5.2)}},
	} {
		t.Run(c.name, func(t *testing.T) {
			require.Equal(t, c.want, concentratedLoads(loadedProblem(c.loads...), 1))
		})
	}
}

func meters(load int, from, to float64) patch {
	return patch{load, units.Metre.Of(from), units.Metre.Of(to)}
}

// The part of a strip over a length, by the trapezoid's area.
func TestWithinAStrip(t *testing.T) {
	s := strip{from: 2, to: 6, w: 10, wEnd: 30}
	for _, c := range []struct{ a, z, want float64 }{
		{2, 6, 80}, {0, 9, 80}, {2, 4, 30}, {4, 6, 50}, {3, 5, 40}, {0, 1, 0}, {7, 9, 0}, {0, 2, 0}, {6, 9, 0},
	} {
		require.InDelta(t, c.want, s.within(c.a, c.z), 1e-12, c)
	}
	require.Equal(t, 80.0, s.total())
	point := strip{from: 2, to: 2, w: 10, wEnd: 10}
	require.Equal(t, 0.0, point.within(0, 4), "a strip of no length holds nothing")
}

// More than half of a load within one depth of 1 makes it a concentrated one,
// from the first such length to the last.
func TestHeaviestLength(t *testing.T) {
	for _, c := range []struct {
		name     string
		strips   []strip
		from, to float64 // NaN: not concentrated
	}{
		{"shorter than a depth", []strip{{from: 3, to: 3.25, w: 8, wEnd: 8}}, 3, 3.25},
		{"a little over a depth", []strip{{from: 3, to: 4.25, w: 8, wEnd: 8}}, 3, 4.25},
		{"two depths hold just half in one", []strip{{from: 0, to: 2, w: 8, wEnd: 8}}, math.NaN(), 0},
		{"ten depths", []strip{{from: 0, to: 10, w: 8, wEnd: 8}}, math.NaN(), 0},
		// Light and long, with a triangle on its way whose heavy end is first:
		// the first metre of two holds three quarters of it; or last, where the last
		// of three holds five ninths.
		{"heavy at the start of a piece", []strip{{from: 0, to: 50.3, w: 0.001, wEnd: 0.001}, {from: 50.3, to: 52.3, w: 10, wEnd: 0}, {from: 52.3, to: 100, w: 0.001, wEnd: 0.001}}, 50.3, 51.3},
		{"heavy at the end of a piece", []strip{{from: 0, to: 49.3, w: 0.001, wEnd: 0.001}, {from: 49.3, to: 52.3, w: 0, wEnd: 10}, {from: 52.3, to: 100, w: 0.001, wEnd: 0.001}}, 51.3, 52.3},
	} {
		t.Run(c.name, func(t *testing.T) {
			at, ok := heaviest(c.strips, c.strips[len(c.strips)-1].to, 1, 0)
			require.Equal(t, !math.IsNaN(c.from), ok)
			if ok {
				require.InDelta(t, c.from, at.from.In(units.Metre), 1e-9)
				require.InDelta(t, c.to, at.to.In(units.Metre), 1e-9)
			}
		})
	}

	// Loads of next to nothing are judged like others.
	_, ok := heaviest([]strip{{from: 0, to: 10, w: 0.05, wEnd: 0.05}}, 10, 1, 0)
	require.False(t, ok)
	_, ok = heaviest([]strip{{from: 0, to: 0.5, w: 0.5, wEnd: 0.5}}, 0.5, 1, 0)
	require.True(t, ok)

	// A load below the least is not looked at, and one equal to it neither.
	short := []strip{{from: 0, to: 0.5, w: 8, wEnd: 8}} // 4 in all
	for _, b := range []struct {
		least float64
		ok    bool
	}{{3.99, true}, {4, false}, {5, false}} {
		_, ok := heaviest(short, 0.5, 1, b.least)
		require.Equal(t, b.ok, ok, b.least)
	}

	// A tent of two triangles, four long: a length of 1.5 off its middle by x
	// holds, per height of the tent, 1.21875 - x²/2 of its 2, more than half up to
	// x = √0.4375 = 0.6614. Places are tried in steps of 2.5/64.
	tent := []strip{{from: 3, to: 5, w: 0, wEnd: 10}, {from: 5, to: 7, w: 10, wEnd: 0}}
	at, ok := heaviest(tent, 7, 1.5, 0)
	require.True(t, ok)
	const step = 2.5 / 64
	require.InDelta(t, 5-0.6614-0.75+step/2, at.from.In(units.Metre), step/2)
	require.InDelta(t, 5+0.6614+0.75-step/2, at.to.In(units.Metre), step/2)
}
