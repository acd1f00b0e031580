package aci318

import (
	"context"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// What shear takes for granted is listed, open where only the engineer knows,
// and not listed where it plays no part.
func TestShearAssumptionsAreListed(t *testing.T) {
	tee := beam.Section{Shape: beam.Tee, Width: in(14), Depth: in(24), FlangeThickness: in(5), FlangeWidth: in(60)}
	for _, k := range []struct {
		name string
		code Code
		edit func(b *beam.Brief)
		id   string
		open bool
		says string // empty: not listed
	}{
		{"plain", ACI31819(), func(b *beam.Brief) {}, "section.integral-slab", false, ""},
		{"tee of 24 in", ACI31819(), func(b *beam.Brief) { b.Section = tee }, "section.integral-slab", true, "the flange is that of a slab"},
		{"tee above 24 in, which is never exempt", ACI31819(), func(b *beam.Brief) { b.Section = tee; b.Section.Depth = in(24.1) }, "section.integral-slab", false, ""},
		{"isolated tee", ACI31819(), func(b *beam.Brief) { b.Section = tee; b.Section.Isolated = true }, "section.integral-slab", false, ""},
		{"tee with its slab", ACI31819(), func(b *beam.Brief) {
			b.Section = tee
			b.Section.FlangeWidth, b.Section.Slab = units.Length{}, beam.Slab{ClearLeft: in(60), ClearRight: in(60)}
		}, "section.integral-slab", false, ""},
		{"tee of 600 mm", ACI31814M(), func(b *beam.Brief) { b.Section = tee; b.Section.Depth = mm(600) }, "section.integral-slab", true, "slab"},
		{"tee of 601 mm", ACI31814M(), func(b *beam.Brief) { b.Section = tee; b.Section.Depth = mm(601) }, "section.integral-slab", false, ""},

		{"no fibres", ACI31819(), func(b *beam.Brief) {}, "concrete.fibres", false, ""},
		{"fibres", ACI31819(), func(b *beam.Brief) { b.Concrete.Fibres = true }, "concrete.fibres", true, "they count for nothing else"},
		{"fibres in lightweight", ACI31819(), func(b *beam.Brief) {
			b.Concrete.Fibres, b.Concrete.Kind, b.Concrete.Density = true, beam.SandLightweight, units.PoundPerCubicFoot.Of(110)
		}, "concrete.fibres", true, "of no account in lightweight concrete"},

		{"no joist", ACI31819(), func(b *beam.Brief) {}, "section.joist", false, ""},
		{"joist", ACI31819(), func(b *beam.Brief) { b.Section.Joist = true }, "section.joist", true, "no more than 30 in clear between ribs"},
		{"joist in SI", ACI31819M(), func(b *beam.Brief) { b.Section.Joist = true }, "section.joist", true, "no more than 750 mm clear between ribs"},
		{"depth of a rib", ACI31819(), func(b *beam.Brief) { b.Section.Joist = true }, "reading.joist-rib", false, "below the slab"},

		{"nothing hangs", ACI31819(), func(b *beam.Brief) {}, "reading.hanger", false, ""},
		{"a load hangs", ACI31819(), func(b *beam.Brief) { b.Loads[0].Hung = true }, "reading.hanger", false, "half the depth on each side"},
		{"detailed", ACI31814(), func(b *beam.Brief) { b.Readings.ShearMethod = beam.DetailedShear }, "reading.shear-method", false, "22.5.6.1 and 22.5.7.1"},
	} {
		t.Run(k.name, func(t *testing.T) {
			b := bare()
			k.edit(&b)
			a, ok := assumptionsOf(t, k.code, b)[k.id]
			require.Equal(t, k.says != "", ok)
			require.Contains(t, a.Assumed, k.says)
			require.Equal(t, k.open, a.Open)
		})
	}
}

// A layout with stirrups that lean and with bent bars says how they were
// counted, and that the anchorage of bent bars is the engineer's to see.
func TestSlopesAreListed(t *testing.T) {
	b := usBrief()
	layout := func() beam.Layout {
		return beam.Layout{
			Longitudinal: []beam.Row{
				{Bar: "#8", Count: 5, Face: beam.Bottom, Layer: 1}, {Bar: "#6", Count: 2, Face: beam.Top, Layer: 1},
			},
			Transverse: []beam.Zone{{Span: 1, Bar: "#3", Legs: 2, Spacing: in(10), From: in(6), To: in(258), Form: "closed"}},
		}
	}
	ids := func(b beam.Brief, l beam.Layout) map[string]beam.Assumption {
		r, err := beam.CheckLayout(context.Background(), ACI31819(), b, l)
		require.NoError(t, err)
		out := map[string]beam.Assumption{}
		for _, a := range r.Assumptions {
			out[a.ID] = a
		}
		return out
	}
	plain := ids(b, layout())
	for _, id := range []string{"reading.inclined-stirrups", "reading.bent-bars", "bent-bars.anchorage", "reinforcement.bent-yield-cap"} {
		require.NotContains(t, plain, id)
	}
	l := layout()
	l.Transverse[0].Angle = 90
	require.NotContains(t, ids(b, l), "reading.inclined-stirrups")
	l.Transverse[0].Angle = 60
	require.Contains(t, ids(b, l), "reading.inclined-stirrups")

	l = layout()
	l.Bent = []beam.BentBars{{Bar: "#8", Count: 2, Span: 1, At: in(30), Angle: 45, Rises: "left"}}
	bent := ids(b, l)
	require.Contains(t, bent["reading.bent-bars"].Assumed, "3 √f'c bw d")
	require.True(t, bent["reading.bent-bars"].Holds)
	require.True(t, bent["bent-bars.anchorage"].Open)
	require.NotContains(t, bent, "reinforcement.bent-yield-cap")
	b.Reinforcement.Yield = units.KSI.Of(80)
	require.Contains(t, ids(b, l)["reinforcement.bent-yield-cap"].Assumed, "60000 psi of their 80000 psi")
}

// The whole way through: a layout that fails in shear passes with bars bent
// against it at both ends, and fails again with one of them bent the wrong way.
func TestBentBarsDecideALayout(t *testing.T) {
	b := usBrief()
	l := beam.Layout{
		Longitudinal: []beam.Row{
			{Bar: "#8", Count: 5, Face: beam.Bottom, Layer: 1}, {Bar: "#6", Count: 2, Face: beam.Top, Layer: 1},
		},
		Transverse: []beam.Zone{{Span: 1, Bar: "#3", Legs: 2, Spacing: in(10.5), From: in(6), To: in(258), Form: "closed"}},
		Bent: []beam.BentBars{
			{Bar: "#5", Count: 1, Span: 1, At: in(24), Angle: 45, Rises: "left", Bends: 9, Spacing: in(12)},
			{Bar: "#5", Count: 1, Span: 1, At: in(144), Angle: 45, Rises: "right", Bends: 9, Spacing: in(12)},
		},
	}
	b.Loads[1].Intensity = units.KipPerFoot.Of(3.2)
	strength := func(l beam.Layout) beam.Check {
		r, err := beam.CheckLayout(context.Background(), ACI31819(), b, l)
		require.NoError(t, err)
		require.Empty(t, r.Refusals)
		for _, c := range r.Checks {
			if c.ID == "shear.strength" {
				return c
			}
		}
		require.Fail(t, "no strength in shear")
		return beam.Check{}
	}
	require.Equal(t, beam.Pass, strength(l).Outcome)
	l.Bent[1].Rises = "left"
	require.Equal(t, beam.Fail, strength(l).Outcome)
	l.Bent = nil
	require.Equal(t, beam.Fail, strength(l).Outcome)
}

// The hot path allocates nothing for any shape, exemption or joist.
func TestJudgingShearOfAnyShapeAllocatesNothing(t *testing.T) {
	for _, c := range Editions() {
		for name, edit := range map[string]func(*beam.Brief){
			"tee": func(b *beam.Brief) {
				b.Section = beam.Section{Shape: beam.Tee, Width: in(14), Depth: in(24), FlangeThickness: in(5), FlangeWidth: in(60)}
			},
			"joist": func(b *beam.Brief) { *b = joistBrief(nil); b.Section.Width = in(7) },
			"light": func(b *beam.Brief) {
				b.Concrete.Kind, b.Concrete.Normal, b.Concrete.Density = beam.FineBlend, 0.5, units.PoundPerCubicFoot.Of(110)
			},
		} {
			tr := shearTrial(t, c, edit)
			addZone(tr, 2, 8, 6, 258)
			dst := c.e.judgeShearing(nil, tr)
			dst = c.e.judgeWhole(dst, tr)
			require.Zero(t, testing.AllocsPerRun(20, func() { dst = c.e.judgeWhole(c.e.judgeShearing(dst[:0], tr), tr) }), "%s %s", c.e.id, name)
		}
	}
}

// More stirrups never turn a pass into a fail, with loads that hang and stirrups
// that lean as without: the search relies on it.
func TestCloserStirrupsNeverFailWhereWiderPass(t *testing.T) {
	for _, c := range Editions() {
		for name, edit := range map[string]func(*beam.Brief){
			"plain": nil,
			"hung":  func(b *beam.Brief) { b.Loads[1].Hung = true },
			"tee": func(b *beam.Brief) {
				b.Section = beam.Section{Shape: beam.Tee, Width: in(14), Depth: in(24), FlangeThickness: in(5), FlangeWidth: in(60)}
			},
		} {
			for _, angle := range []float64{0, 60} {
				failed := ""
				for spacing := 3.0; spacing <= 14; spacing += 0.25 {
					tr := shearTrial(t, c, edit)
					addZone(tr, 2, spacing, 6, 132)
					addZone(tr, 2, spacing, 132, 258)
					tr.Zones[0].Angle, tr.Zones[1].Angle = angle, angle
					checks := c.e.judgeShearing(nil, tr)
					require.False(t, failed != "" && !beam.Failing(checks), "%s %s: %s failed closer than %g in.", c.e.id, name, failed, spacing)
					for i := range checks {
						if checks[i].Outcome == beam.Fail {
							failed = checks[i].ID
						}
					}
				}
				require.NotEmpty(t, failed, "the widest must fail, or this shows nothing")
			}
		}
	}
}
