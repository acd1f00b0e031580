package aci318

import (
	"strings"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// drawTwisted is a span under loads and torques of both paths.
func drawTwisted(r *rapid.T) func(*beam.Brief, *beam.Layout) {
	kinds := rapid.SampledFrom([][2]statics.SupportKind{{statics.Pinned, statics.Roller}, {statics.Fixed, statics.Fixed}, {statics.Fixed, statics.Free}, {statics.Fixed, statics.Roller}}).Draw(r, "supports")
	torque := func(name string) beam.Load {
		l := beam.Load{
			Case: rapid.SampledFrom([]beam.LoadCase{beam.Dead, beam.Live}).Draw(r, name), Shape: beam.Torque,
			Moment: units.KipFoot.Of(float64(rapid.IntRange(-60, 60).Draw(r, name))), At: units.Foot.Of(float64(rapid.IntRange(3, 21).Draw(r, name))),
			Path: rapid.SampledFrom([]beam.TorquePath{beam.EquilibriumTorque, beam.CompatibilityTorque}).Draw(r, name),
		}
		if rapid.Bool().Draw(r, name) {
			l.Shape, l.At = beam.UniformTorque, units.Length{}
		}
		return l
	}
	loads := []beam.Load{
		{Case: beam.Dead, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(0.25 * float64(rapid.IntRange(0, 8).Draw(r, "w")))},
		{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(float64(rapid.IntRange(0, 20).Draw(r, "P"))), At: units.Foot.Of(12)},
		torque("1"), torque("2"),
	}
	if rapid.Bool().Draw(r, "triangle") {
		loads = append(loads, beam.Load{Case: beam.Live, Shape: beam.Partial, Varies: true, To: units.Foot.Of(24), IntensityEnd: units.KipPerFoot.Of(1.5)})
	}
	return func(b *beam.Brief, l *beam.Layout) {
		twistedSpan(1, 12)(b, l)
		b.Supports[0].Kind, b.Supports[1].Kind = kinds[0], kinds[1]
		if kinds[1] == statics.Free {
			b.Supports[1].Width = units.Length{}
			l.Transverse[0].To = in(288)
		}
		b.Loads = loads
		l.Longitudinal[0], l.Longitudinal[1] = bottom(5, "#9"), top(5, "#9")
	}
}

// No section of a span is worse than the one that the checks report: sections
// taken closely along it, each by itself, never exceed their utilization.
func TestNoSectionIsWorseInTorsion(t *testing.T) {
	rapid.Check(t, func(r *rapid.T) {
		code := rapid.SampledFrom(Editions()[:1]).Draw(r, "code")
		_, trial := twistedTrial(t, code, drawTwisted(r))
		if !trial.Twisted {
			return
		}
		e := code.e
		checks := e.judgeTorsionBars(e.judgeShearing(nil, trial), trial)
		reported := map[string]float64{}
		for i := range checks {
			reported[checks[i].ID] = max(reported[checks[i].ID], checks[i].Utilization)
		}
		f := e.newTorsionFaces(trial)
		z := e.newWebZone(trial, 1, 0, trial.Zones[0].Spacing)
		reach := z.torsion.reach
		z.torsion.reach = units.Length{} // each section by itself,
		transverse := 0.0                // but for what reaches it
		ends := shearEnds(trial, 1)
		for i := range trial.Forces.Combinations() {
			from, _ := ends[0].start(&trial.Forces, i, 1)
			to, _ := ends[1].start(&trial.Forces, i, 1)
			left, right := trial.Faces(1)
			var sections []beam.Action
			meet := func(at units.Length, fromRight bool) {
				a := trial.Forces.Action(i, 1, at, fromRight)
				if q := f.strength.torque(e, &a); !q.neglected {
					m := e.momentIn(a.Moment)
					f.part(&a, m, m, f.leastActing(&a, q.used), q.used)
				}
				if !at.Less(from) && !to.Less(at) {
					sections = append(sections, a)
				}
			}
			for k := range 301 {
				meet(left.Add(right.Sub(left).Scale(float64(k)/300)), k < 300)
			}
			for _, b := range trial.Forces.Breaks(nil, 1) { // where a torque may be greatest
				if left.Less(b) && b.Less(right) {
					meet(b, false)
					meet(b, true)
				}
			}
			z.combination, z.from, z.to = i, from, to
			for _, a := range sections {
				z.point(a)
				near := sectionTorque{}
				for _, b := range sections {
					if q := f.strength.torque(e, &b); !q.neglected && b.At.Sub(a.At).Abs().AtMost(reach) {
						near.used = max(near.used, q.used)
					}
				}
				if near.used > 0 && !a.Moment.IsZero() {
					web := &z.web[0]
					if a.Moment.Compare(units.Moment{}) < 0 {
						web = &z.web[1]
					}
					s := web.at(e, shearForces{shear: a.Shear, moment: a.Moment})
					v := z.torsion.cage.at(near, web, &s, z.torsion.legs, 0)
					transverse = max(transverse, ratio(v.outer, z.torsion.leg))
				}
			}
		}
		for id, found := range map[string]float64{
			"torsion.section": z.torsion.section.utilization, "torsion.transverse": max(transverse, z.torsion.transverse.utilization),
			"torsion.longitudinal.bottom": f.faces[0].worstRatio, "torsion.longitudinal.top": f.faces[1].worstRatio,
		} {
			if found > reported[id]*(1+1e-7) {
				t.Fatalf("%s: %v reported, %v found", id, reported[id], found)
			}
		}
		// The bound of the bars is close to what they need.
		for i, id := range torsionFaceIDs {
			if worst := f.faces[i].worstRatio; reported[id] < 1e8 && reported[id] > worst+0.1 {
				t.Fatalf("%s: %v reported, %v needed", id, reported[id], worst)
			}
		}
	})
}

// A closer spacing never makes anything of torsion fail that passes with a
// wider one: the search for stirrups relies on it.
func TestCloserStirrupsNeverHarm(t *testing.T) {
	rapid.Check(t, func(r *rapid.T) {
		code := rapid.SampledFrom(Editions()).Draw(r, "code")
		edit := drawTwisted(r)
		if code.e.system == units.SI {
			return
		}
		wide := rapid.Float64Range(4, 14).Draw(r, "wide")
		close := rapid.Float64Range(2, wide).Draw(r, "close")
		fails := func(s float64) map[string]bool {
			_, trial := twistedTrial(t, code, func(b *beam.Brief, l *beam.Layout) { edit(b, l); l.Transverse[0].Spacing = in(s) })
			out := map[string]bool{}
			checks := code.e.judgeShearing(nil, trial)
			for i := range checks {
				if checks[i].Outcome == beam.Fail && strings.HasPrefix(checks[i].ID, "torsion.") {
					out[checks[i].ID] = true
				}
			}
			return out
		}
		before := fails(wide)
		for id := range fails(close) {
			if !before[id] {
				t.Fatalf("%s fails at %v in. and passes at %v in.", id, close, wide)
			}
		}
	})
}

// Judging torsion without working allocates nothing.
func TestJudgingTorsionAllocatesNothing(t *testing.T) {
	for _, c := range []Code{ACI31814(), ACI31819()} {
		_, trial := twistedTrial(t, c, func(b *beam.Brief, l *beam.Layout) {
			twistedSpan(40, 9)(b, l)
			b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.UniformTorque, Moment: units.KipFoot.Of(20), Path: beam.CompatibilityTorque})
		})
		require.True(t, trial.Twisted)
		trial.Record = false
		var dst []beam.Check
		for _, g := range []beam.Group{beam.Shearing, beam.Bending, beam.Whole} {
			dst = c.Judge(dst[:0], g, trial)
			require.Zero(t, testing.AllocsPerRun(20, func() { dst = c.Judge(dst[:0], g, trial) }), "%s, group %d", c.e.id, g)
		}
		require.Zero(t, testing.AllocsPerRun(20, func() { c.e.twists(trial.Problem) }))
	}
}

func BenchmarkJudgeTorsion(b *testing.B) {
	_, trial := twistedTrial(b, ACI31819(), func(p *beam.Brief, l *beam.Layout) {
		twistedSpan(40, 9)(p, l)
		p.Loads = append(p.Loads, beam.Load{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1)})
	})
	trial.Record = false
	for name, g := range map[string]beam.Group{"shearing": beam.Shearing, "bending": beam.Bending, "whole": beam.Whole} {
		b.Run(name, func(b *testing.B) {
			var dst []beam.Check
			b.ReportAllocs()
			for b.Loop() {
				dst = ACI31819().Judge(dst[:0], g, trial)
			}
		})
	}
}
