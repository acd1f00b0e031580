package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// hangTrial is the beam of the shear tests with a load that hangs.
func hangTrial(t *testing.T, c Code, l beam.Load) *beam.Trial {
	tr := shearTrial(t, c, func(b *beam.Brief) {
		l.Hung, l.Case = true, beam.Live
		b.Loads = append(b.Loads, l)
	})
	tr.Record = true
	return tr
}

// Own calculation: 1 kip/ft of live load hangs over the whole span of the beam
// under w = 5.42 + 1.6 = 7.02 kip/ft. At the face, 6 in. from the centre, Vu =
// 7.02 × 10.5 = 73.71 kip; Vc = 2√4000 × 14 × 21.625; the stirrups lift 1.6
// kip/ft, which takes 1600/12/(0.75 × 60,000) in2/in. beside what shear takes.
func TestHungLoadNeedsStirrupsBesideShear(t *testing.T) {
	vc := 2 * math.Sqrt(4000) * 14 * 21.625
	lift := 1600.0 / 12 / (0.75 * 60000)
	shear := (73710/0.75 - vc) / (60000 * 21.625)
	for _, e := range []*edition{&us14, &us19} {
		for _, k := range []struct {
			spacing float64
			want    beam.Outcome
		}{{0.22 / (lift + shear), beam.Pass}, {0.22 / (lift + shear) * 1.001, beam.Fail}, {0.22 / shear, beam.Fail}} {
			tr := hangTrial(t, Code{e}, beam.Load{Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1)})
			addZone(tr, 2, k.spacing, 6, 258)
			checks := e.judgeShearing(nil, tr)
			c := only(t, checks, "hanger.stirrups")
			require.Equal(t, k.want, c.Outcome, "%s at %g", e.id, k.spacing)
			require.Equal(t, "R9.4.3.2", c.Clause)
			require.Equal(t, noteHanger, c.Reason)
			require.Equal(t, "1.2D + 1.6L", c.Combination)
			require.InEpsilon(t, lift+shear, valueIn(t, c.Demand, "in2/in"), 1e-9)
			require.InEpsilon(t, 0.22/k.spacing, valueIn(t, c.Capacity, "in2/in"), 1e-9)
			requireEvaluable(t, &c)
			// Shear alone passes all the same: what hangs is not forgotten, and not
			// counted twice.
			require.Equal(t, beam.Pass, only(t, checks, "shear.strength").Outcome)
		}
	}
	// The same load on top needs nothing of the kind.
	tr := shearTrial(t, ACI31819(), nil)
	addZone(tr, 2, 8, 6, 258)
	require.Empty(t, checksOf(us19.judgeShearing(nil, tr), "hanger.stirrups"))
}

// A point load is lifted within half the depth, 12 in., on each side; a partial
// load within its own length.
func TestWhereHungLoadsAreLifted(t *testing.T) {
	point := func(at float64) beam.Load {
		return beam.Load{Shape: beam.PointLoad, Force: units.Kip.Of(24), At: in(at)}
	}
	partial := beam.Load{
		Shape: beam.Partial, Intensity: units.KipPerFoot.Of(1), IntensityEnd: units.KipPerFoot.Of(3), Varies: true, From: in(60), To: in(120),
	}
	for _, k := range []struct {
		name string
		load beam.Load
		at   float64
		want float64 // kip/ft, factored by 1.6
	}{
		{"at the point load", point(100), 100, 1.6 * 12},
		{"half a depth left of it", point(100), 88, 1.6 * 12},
		{"beyond that", point(100), 87.99, 0},
		{"half a depth right of it", point(100), 112, 1.6 * 12},
		{"beyond that too", point(100), 112.01, 0},
		{"near the face: from the face on", point(10), 6, 1.6 * 24 / 16 * 12},
		{"at the face", point(6), 6, 1.6 * 24},
		{"over the support", point(5.9), 6, 0},
		{"beyond the other face", point(258.1), 258, 0},
		{"start of the partial load", partial, 60, 1.6},
		{"before it", partial, 59.9, 0},
		{"middle of it", partial, 90, 1.6 * 2},
		{"end of it", partial, 120, 1.6 * 3},
		{"after it", partial, 120.1, 0},
		{"uplift from below", beam.Load{Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(-1)}, 90, 0},
		{"a couple", beam.Load{Shape: beam.Couple, Moment: units.KipFoot.Of(10), At: in(100)}, 100, 0},
		{"another span's", beam.Load{Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1), Span: 2}, 90, 0},
	} {
		t.Run(k.name, func(t *testing.T) {
			tr := shearTrial(t, ACI31819(), nil)
			k.load.Hung, k.load.Case = true, beam.Live
			tr.Brief.Loads = append(tr.Brief.Loads, k.load)
			got := units.NewtonPerMetre.Of(hungLoad(tr.Problem, 1, "1.2D + 1.6L", in(k.at)))
			require.InDelta(t, k.want, got.In(units.KipPerFoot), 1e-9)
			require.Zero(t, hungLoad(tr.Problem, 1, "1.4D", in(k.at)), "a live load is no part of 1.4D")
			require.Zero(t, hungLoad(tr.Problem, 1, "no such combination", in(k.at)))
			tr.Brief.Loads[len(tr.Brief.Loads)-1].Hung = false
			require.Zero(t, hungLoad(tr.Problem, 1, "1.2D + 1.6L", in(k.at)), "on top")
		})
	}
	// Loads add up; one that presses from below relieves nothing.
	tr := shearTrial(t, ACI31819(), nil)
	for _, w := range []float64{1, -1, 2} {
		tr.Brief.Loads = append(tr.Brief.Loads, beam.Load{Case: beam.Dead, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(w), Hung: true})
	}
	require.InEpsilon(t, 1.2*3, units.NewtonPerMetre.Of(hungLoad(tr.Problem, 1, "1.2D + 1.6L", in(90))).In(units.KipPerFoot), 1e-9)
}

// Only the zone within half a depth of a hung point load is asked to lift it,
// however it lies to the load.
func TestHungPointLoadAsksItsOwnZone(t *testing.T) {
	tr := hangTrial(t, ACI31819(), beam.Load{Shape: beam.PointLoad, Force: units.Kip.Of(10), At: in(132)})
	addZone(tr, 2, 8, 6, 110)
	addZone(tr, 2, 10, 110, 154)
	addZone(tr, 2, 8, 154, 258)
	found := checksOf(us19.judgeShearing(nil, tr), "hanger.stirrups")
	require.Len(t, found, 1)
	// 16 kip over 24 in. at a fifth of a kip's shear; the worst is an end of the
	// length, 12 in. from the load: Vu = 8 + 5.42 = 13.42 kip is below φVc.
	require.InEpsilon(t, 16000.0/24/(0.75*60000), valueIn(t, found[0].Demand, "in2/in"), 1e-9)
	require.InEpsilon(t, 0.022, valueIn(t, found[0].Capacity, "in2/in"), 1e-9)

	// Without stirrups there is nothing to hang on.
	tr = hangTrial(t, ACI31819(), beam.Load{Shape: beam.PointLoad, Force: units.Kip.Of(1), At: in(132)})
	addZone(tr, 2, 8, 6, 110)
	addZone(tr, 2, 8, 154, 258)
	found = checksOf(us19.judgeShearing(nil, tr), "hanger.stirrups")
	require.Len(t, found, 1)
	require.Equal(t, beam.Fail, found[0].Outcome)
	require.Zero(t, valueIn(t, found[0].Capacity, "in2/in"))
	requireEvaluable(t, &found[0])

	// Too far apart to count is as good as none.
	tr = hangTrial(t, ACI31819(), beam.Load{Shape: beam.PointLoad, Force: units.Kip.Of(1), At: in(132)})
	addZone(tr, 2, 11, 6, 258)
	require.Equal(t, beam.Fail, only(t, us19.judgeShearing(nil, tr), "hanger.stirrups").Outcome)
}

// Stirrups that lean lift with their upright part, sin α, and carry shear with
// sin α + cos α; bent bars carry shear and lift nothing. Own calculation in SI:
// φ = 0.75, 20 N/mm hung, Vu/φ - Vc = 90,000 N of which bent bars carry 30,000.
func TestLiftOfLeaningStirrups(t *testing.T) {
	s := shearMids[&si19]
	s.av, s.s, s.angle = 258, 200, 60
	w, v := s.evaluate(&si19)
	v.needed, v.bent = 90000, 30000
	h := w.lifting(&si19, &v, 20000) // N/m
	sin := math.Sqrt(3) / 2
	require.InEpsilon(t, 20, h.load, 1e-12)
	require.InEpsilon(t, 20/(0.75*420*sin), h.lift, 1e-12)
	require.InEpsilon(t, 60000/(420*(sin+0.5)*425), h.shear, 1e-12)
	require.InEpsilon(t, 258.0/200, h.provided, 1e-12)
	v.bent = 100000
	require.Zero(t, w.lifting(&si19, &v, 20000).shear)

	for _, angle := range []float64{45, 60} {
		tr := hangTrial(t, ACI31819(), beam.Load{Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(0.5)})
		addZone(tr, 2, 6, 6, 132)
		addZone(tr, 2, 6, 132, 258)
		tr.Zones[0].Angle, tr.Zones[1].Angle = angle, angle
		bend(t, tr, beam.BentBars{Bar: "#5", Count: 1, At: in(12), Angle: 45, Rises: "left"})
		for _, c := range checksOf(us19.judgeShearing(nil, tr), "hanger.stirrups") {
			requireEvaluable(t, &c)
		}
	}
}

// What hangs is judged at the face and never at d, and what brings the load to
// the stirrups is named as not judged.
func TestHungLoadsAreNamed(t *testing.T) {
	b := usBrief()
	listed := assumptionsOf(t, ACI31819(), b)
	require.NotContains(t, listed, "reading.hanger")
	require.NotContains(t, listed["shear.direct-support"].Assumed, "ledges")
	require.True(t, listed["shear.direct-support"].Open)
	b.Section = beam.Section{Shape: beam.InvertedTee, Width: in(14), Depth: in(24), FlangeThickness: in(8), FlangeWidth: in(30)}
	require.Contains(t, assumptionsOf(t, ACI31819(), b)["shear.direct-support"].Assumed, "though the beam has ledges")
	b.Loads[1].Hung = true
	listed = assumptionsOf(t, ACI31819(), b)
	require.Contains(t, listed, "reading.hanger")
	require.NotContains(t, listed, "shear.direct-support")
}
