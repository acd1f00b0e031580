package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// Table 9.3.1.1 with its multipliers for yield strength and lightweight
// concrete. Own calculations from the clauses.
func TestLeastDepth(t *testing.T) {
	pinned, fixed, free := statics.Pinned, statics.Fixed, statics.Free
	for _, c := range []struct {
		name        string
		code        Code
		left, right statics.SupportKind
		fy          units.Stress
		kind        beam.ConcreteKind
		density     units.Density
		want        float64 // in., of a 20 ft span, or mm, of 6 m
	}{
		{"simple", ACI31819(), pinned, pinned, units.KSI.Of(60), beam.Normalweight, units.Density{}, 240.0 / 16},
		{"one end continuous", ACI31814(), fixed, pinned, units.KSI.Of(60), beam.Normalweight, units.Density{}, 240 / 18.5},
		{"the other end continuous", ACI31814(), pinned, fixed, units.KSI.Of(60), beam.Normalweight, units.Density{}, 240 / 18.5},
		{"both ends continuous", ACI31819(), fixed, fixed, units.KSI.Of(60), beam.Normalweight, units.Density{}, 240.0 / 21},
		{"cantilever, clear projection", ACI31819(), fixed, free, units.KSI.Of(60), beam.Normalweight, units.Density{}, (240 - 6) / 8.0},
		{"cantilever to the left", ACI31819(), free, fixed, units.KSI.Of(60), beam.Normalweight, units.Density{}, (240 - 6) / 8.0},
		{"Grade 40", ACI31814(), pinned, pinned, units.KSI.Of(40), beam.Normalweight, units.Density{}, 240.0 / 16 * 0.8},
		{"Grade 80", ACI31819(), pinned, pinned, units.KSI.Of(80), beam.Normalweight, units.Density{}, 240.0 / 16 * 1.2},
		{"lightweight 100", ACI31819(), pinned, pinned, units.KSI.Of(60), beam.AllLightweight, units.PoundPerCubicFoot.Of(100), 240.0 / 16 * 1.15},
		{"lightweight 115: not less than 1.09", ACI31819(), pinned, pinned, units.KSI.Of(60), beam.SandLightweight, units.PoundPerCubicFoot.Of(115), 240.0 / 16 * 1.09},
		{"lightweight 120 has no multiplier", ACI31819(), pinned, pinned, units.KSI.Of(60), beam.SandLightweight, units.PoundPerCubicFoot.Of(120), 240.0 / 16},
		{"metric", ACI31819M(), pinned, pinned, units.Megapascal.Of(420), beam.Normalweight, units.Density{}, 6000.0 / 16},
		{"metric Grade 550", ACI31819M(), pinned, pinned, units.Megapascal.Of(550), beam.Normalweight, units.Density{}, 6000.0 / 16 * (0.4 + 550.0/700)},
		{"metric lightweight", ACI31814M(), pinned, pinned, units.Megapascal.Of(420), beam.AllLightweight, units.KilogramPerCubicMetre.Of(1600), 6000.0 / 16 * (1.65 - 0.48)},
	} {
		t.Run(c.name, func(t *testing.T) {
			b := usBrief()
			b.Spans[0] = units.Foot.Of(20)
			b.Loads = b.Loads[:1]
			if c.code.e.system == units.SI {
				b.Spans[0] = units.Metre.Of(6)
				b.Reinforcement.Catalog = "astm-metric"
			}
			b.Reinforcement.Yield = c.fy
			b.Concrete.Kind, b.Concrete.Density = c.kind, c.density
			b.Supports[0].Kind, b.Supports[1].Kind = c.left, c.right
			for i := range b.Supports {
				if b.Supports[i].Kind == free {
					b.Supports[i].Width = units.Length{}
				}
			}
			p := problemOf(t, c.code, b)
			d := c.code.e.tableDepth(p, 1)
			require.InEpsilon(t, c.want, d.depth, 1e-12)
			tr := &beam.Trial{Problem: p, Record: true}
			got := only(t, c.code.e.appendDepth(nil, tr), "depth.minimum")
			requireEvaluable(t, &got)
		})
	}
}

// The table stands in for a computed deflection only where it is met and
// nothing that deflection could damage is attached.
func TestDepthAndDeflection(t *testing.T) {
	for _, c := range []struct {
		name       string
		depth      float64 // least: 264/16 = 16.5 in.
		attached   beam.Attachment
		minimum    beam.Outcome
		deflection beam.Outcome
		reason     string
	}{
		{"met", 16.5, beam.NothingAttached, beam.Pass, beam.NotApplicable, noteTableDoes},
		{"met, robust", 16.5, beam.Robust, beam.Pass, beam.NotApplicable, noteTableDoes},
		{"met, fragile", 24, beam.Fragile, beam.Pass, beam.NotJudged, noteFragile},
		{"not met", 16.49, beam.NothingAttached, beam.Fail, beam.NotJudged, noteShallow},
		{"not met, fragile", 16.49, beam.Fragile, beam.Fail, beam.NotJudged, noteFragile},
	} {
		t.Run(c.name, func(t *testing.T) {
			b := usBrief()
			b.Section.Depth, b.Serviceability.Attached = units.Inch.Of(c.depth), c.attached
			tr := &beam.Trial{Problem: problemOf(t, ACI31819(), b)}
			checks := us19.judgeWhole(nil, tr)
			require.Equal(t, c.minimum, only(t, checks, "depth.minimum").Outcome)
			d := only(t, checks, "deflection.computed")
			require.Equal(t, c.deflection, d.Outcome)
			require.Equal(t, c.reason, d.Reason)
		})
	}
	p := problemOf(t, ACI31819(), demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(100)}))
	checks := us19.judgeWhole(nil, &beam.Trial{Problem: p})
	require.Equal(t, beam.NotJudged, only(t, checks, "depth.minimum").Outcome)
	require.Equal(t, beam.NotJudged, only(t, checks, "deflection.computed").Outcome)
}

// 9.2.3.1: 50 times the least width of the compression face.
func TestBracing(t *testing.T) {
	b := usBrief()
	tr := &beam.Trial{Problem: problemOf(t, ACI31819(), b)}
	require.Equal(t, beam.NotJudged, only(t, us19.judgeWhole(nil, tr), "bracing.spacing").Outcome)
	for _, c := range []struct {
		feet float64
		want beam.Outcome
	}{{700.0 / 12, beam.Pass}, {58.4, beam.Fail}} {
		tr.Brief.Braced = units.Foot.Of(c.feet)
		require.Equal(t, c.want, only(t, us19.judgeWhole(nil, tr), "bracing.spacing").Outcome)
	}
}

// What is not judged is named with its reason, always.
func TestWhatIsNotJudgedIsNamed(t *testing.T) {
	tr := &beam.Trial{Problem: problemOf(t, ACI31814(), usBrief())}
	checks := us14.judgeWhole(nil, tr)
	for _, id := range []string{"development.anchorage", "cutoff.extension", "integrity.continuity", "seismic.detailing", "durability.exposure", "fire.cover"} {
		c := only(t, checks, id)
		require.Equal(t, beam.NotJudged, c.Outcome, id)
		require.NotEmpty(t, c.Reason, id)
	}
	require.Empty(t, checksOf(checks, "shear.hanger-steel"))
	tr.Brief.Supports[0].Hung = true
	require.Len(t, checksOf(us14.judgeWhole(nil, tr), "shear.hanger-steel"), 1)
	require.Empty(t, checksOf(us14.judgeWhole(nil, tr), "hanger.ledge"))
	tr.Brief.Supports[0].Hung = false
	tr.Brief.Loads[0].Hung = true
	require.Empty(t, checksOf(us14.judgeWhole(nil, tr), "shear.hanger-steel"))
	require.Len(t, checksOf(us14.judgeWhole(nil, tr), "hanger.ledge"), 1)
}

// Every rule that puts a problem outside the method is named, with the clause
// and the values, before any number is given.
func TestRefusals(t *testing.T) {
	strip := func(from, to float64) func(*beam.Brief) {
		return func(b *beam.Brief) {
			b.Loads = append(b.Loads, beam.Load{
				Case: beam.Live, Shape: beam.Partial, Intensity: units.KipPerFoot.Of(2),
				From: units.Inch.Of(from), To: units.Inch.Of(to),
			})
		}
	}
	point := func(at float64, edit ...func(*beam.Load)) func(*beam.Brief) {
		return func(b *beam.Brief) {
			l := beam.Load{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(10), At: units.Inch.Of(at)}
			for _, f := range edit {
				f(&l)
			}
			b.Loads = append(b.Loads, l)
		}
	}
	demand := func(d beam.Demand) func(*beam.Brief) {
		return func(b *beam.Brief) { *b = demandBrief(d) }
	}
	cantilever := func(length float64) func(*beam.Brief) {
		return func(b *beam.Brief) {
			b.Spans[0] = units.Inch.Of(length)
			b.Supports = []beam.Support{{Kind: statics.Fixed}, {Kind: statics.Free}}
		}
	}
	limit := 0.10 * 4000 * 14 * 24.0 // lb
	for _, c := range []struct {
		name string
		code Code
		edit func(*beam.Brief)
		rule string // empty: none
		says string
	}{
		{"within scope", ACI31819(), func(*beam.Brief) {}, "", ""},
		{"f'c at the least", ACI31819(), func(b *beam.Brief) { b.Concrete.Strength = units.PSI.Of(2500) }, "", ""},
		{"f'c below it", ACI31819(), func(b *beam.Brief) { b.Concrete.Strength = units.PSI.Of(2499) }, "scope.concrete-strength", "2500 psi"},
		{"f'c at the least, metric", ACI31814M(), func(b *beam.Brief) { b.Concrete.Strength = units.Megapascal.Of(17) }, "", ""},
		{"f'c below it, metric", ACI31814M(), func(b *beam.Brief) { b.Concrete.Strength = units.Megapascal.Of(16.9) }, "scope.concrete-strength", "17 MPa"},
		{"Grade 100 in 318-19", ACI31819(), func(b *beam.Brief) { b.Reinforcement.Yield = units.KSI.Of(100) }, "", ""},
		{"above Grade 100", ACI31819(), func(b *beam.Brief) { b.Reinforcement.Yield = units.KSI.Of(101) }, "scope.steel-grade", "100000 psi"},
		{"Grade 80 in 318-14", ACI31814(), func(b *beam.Brief) { b.Reinforcement.Yield = units.KSI.Of(80) }, "", ""},
		{"Grade 100 in 318-14", ACI31814(), func(b *beam.Brief) { b.Reinforcement.Yield = units.KSI.Of(100) }, "scope.steel-grade", "80000 psi"},

		{"bars of another standard", ACI31819(), func(b *beam.Brief) { b.Reinforcement.Catalog = "en-10080" }, "scope.bar-catalog", "en-10080"},

		// h = 24 in.: 4h = 96 in. clear; supports are 12 in. wide.
		{"clear span above 4h", ACI31819(), func(b *beam.Brief) { b.Spans[0] = units.Inch.Of(108.1) }, "", ""},
		{"clear span of 4h", ACI31819(), func(b *beam.Brief) { b.Spans[0] = units.Inch.Of(108) }, "scope.deep-beam", "96 in"},
		{"cantilever above 2h", ACI31819(), cantilever(48.1), "", ""},
		{"cantilever of 2h", ACI31819(), cantilever(48), "scope.deep-beam", "projection 48 in"},

		// 2h = 48 in. from the face at 6 in.
		{"load beyond 2h", ACI31819(), point(54.01), "", ""},
		{"load at 2h", ACI31819(), point(54), "scope.load-within-2h", "48 in from the face of support 1"},
		{"load near the right support", ACI31819(), point(240), "scope.load-within-2h", "support 2"},
		{"load over the support", ACI31819(), point(5), "", ""},
		{"short load near the support", ACI31819(), strip(50, 74), "scope.load-within-2h", "44 in from the face of support 1"},
		{"short load across the face", ACI31819(), strip(2, 10), "scope.load-within-2h", "0 in from the face of support 1"},
		{"short load beyond 2h", ACI31819(), strip(54.01, 78), "", ""},
		{"load over less than 2h near the support", ACI31819(), strip(50, 97.9), "scope.load-within-2h", "support 1"},
		{"load over more than 2h near the support", ACI31819(), strip(50, 98.1), "", ""},
		{"heavy end of a triangle near the support", ACI31819(), func(b *beam.Brief) {
			b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.Partial, Varies: true, Intensity: units.KipPerFoot.Of(20), From: units.Inch.Of(8), To: units.Inch.Of(80)})
		}, "scope.load-within-2h", "support 1"},
		{"an even load typed in pieces", ACI31819(), func(b *beam.Brief) {
			for i := range 22 {
				b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.Partial, Intensity: units.KipPerFoot.Of(1.5), From: units.Foot.Of(float64(i)), To: units.Foot.Of(float64(i + 1))})
			}
		}, "", ""},
		{"a load not worth a look", ACI31819(), point(30, func(l *beam.Load) { l.Force = units.PoundForce.Of(50) }), "", ""},
		{"load hung from the soffit", ACI31819(), point(30, func(l *beam.Load) { l.Hung = true }), "", ""},
		{"load of nothing", ACI31819(), point(30, func(l *beam.Load) { l.Force = units.Force{} }), "", ""},
		{"support hung", ACI31819(), func(b *beam.Brief) { point(30)(b); b.Supports[0].Hung = true }, "", ""},
		{"load at a free end", ACI31819(), func(b *beam.Brief) { cantilever(120)(b); point(120)(b) }, "", ""},

		{"small compression", ACI31819(), demand(beam.Demand{Name: "A", Moment: units.KipFoot.Of(50), Axial: units.PoundForce.Of(limit * 0.999)}), "", ""},
		{"compression at 0.10 f'c Ag", ACI31819(), demand(beam.Demand{Name: "A", Moment: units.KipFoot.Of(50), Axial: units.PoundForce.Of(limit)}), "scope.axial", "(A)"},
		{"tension", ACI31819(), demand(beam.Demand{Name: "A", Moment: units.KipFoot.Of(50), Axial: units.PoundForce.Of(-limit)}), "", ""},

		{"torque below the threshold", ACI31819(), demand(beam.Demand{Name: "A", Moment: units.KipFoot.Of(50), Torque: units.KipFoot.Of(5.8)}), "", ""}, // φTth = 5.87 kip-ft
		{"torque above the threshold", ACI31819(), demand(beam.Demand{Name: "A", Moment: units.KipFoot.Of(50), Torque: units.KipFoot.Of(-5.9)}), "", ""},
		{"unnamed demand", ACI31819(), demand(beam.Demand{Moment: units.KipFoot.Of(50), Axial: units.PoundForce.Of(2 * limit)}), "scope.axial", "268.8 kip is"},
		{"torque on a span", ACI31819(), func(b *beam.Brief) {
			b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.UniformTorque, Moment: units.KipFoot.Of(10)})
		}, "", ""},
	} {
		t.Run(c.name, func(t *testing.T) {
			b := usBrief()
			c.edit(&b)
			found := refusalsOf(t, c.code, b)
			if c.rule == "" {
				require.Empty(t, found)
				return
			}
			require.Len(t, found, 1)
			r, ok := found[c.rule]
			require.True(t, ok, "%v", found)
			require.NotEmpty(t, r.Clause)
			require.Contains(t, r.Detail, c.says)
		})
	}
}

// Several rules are named together.
func TestEveryRefusalIsNamed(t *testing.T) {
	b := usBrief()
	b.Spans[0] = units.Inch.Of(100)
	b.Concrete.Strength = units.PSI.Of(2000)
	b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(10), At: units.Inch.Of(50)})
	found := refusalsOf(t, ACI31819(), b)
	for _, rule := range []string{"scope.concrete-strength", "scope.deep-beam", "scope.load-within-2h"} {
		require.Contains(t, found, rule)
	}
}
