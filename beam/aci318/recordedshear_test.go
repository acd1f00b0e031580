package aci318

import (
	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// The rest of the recorded calculations: stirrups and bent bars, torsion, bars in
// compression, deep beams, and questions about bare sections.

func recordedStirrups() []recorded {
	wide := with(usBrief(), func(b *beam.Brief) {
		b.Section.Width = in(36)
		b.Loads[0].Intensity, b.Loads[1].Intensity = units.KipPerFoot.Of(3), units.KipPerFoot.Of(5)
	})
	rows := []beam.Row{bottom(8, "#9"), top(6, "#5")}
	large := with(usBrief(), func(b *beam.Brief) { b.Reinforcement.StirrupYield = psi(60000); b.Section.Width = in(18) })
	narrow := []beam.Row{bottom(4, "#9"), top(2, "#5")}
	strip := func(span int, from, to float64) beam.Load {
		return beam.Load{Case: beam.Live, Shape: beam.Partial, Span: span, Intensity: units.KipPerFoot.Of(6), From: in(from), To: in(to)}
	}
	uneven := with(usBrief(), func(b *beam.Brief) {
		b.Section.Depth = in(20)
		b.Loads[1] = strip(0, 6, 110)
		b.Loads = append(b.Loads, beam.Load{Case: beam.Dead, Shape: beam.PointLoad, Force: units.Kip.Of(8), At: in(170)})
	})
	lifted := with(usBrief(), func(b *beam.Brief) {
		b.Loads[1] = beam.Load{Case: beam.Wind, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(-5)}
		b.Supports[1].Hung = true
	})
	return []recorded{
		{name: "wide beam, six legs", code: ACI31819(), brief: wide, layout: layout(rows, run(1, "#4", 6, 9, 0, 264))},
		{name: "wide beam, four legs, halved spacings", code: ACI31819(), brief: with(wide, func(b *beam.Brief) { b.Loads[1].Intensity = units.KipPerFoot.Of(14) }),
			layout: layout(rows, run(1, "#4", 4, 5, 0, 66), run(1, "#4", 3, 5, 66, 198), run(1, "#4", 4, 6, 198, 264))},
		{name: "wide beam, two legs", code: ACI31814(), brief: wide, layout: layout(rows, run(1, "#4", 2, 9, 0, 264))},
		{name: "legs without bars to bend round", code: ACI31819(), brief: wide,
			layout: layout([]beam.Row{bottom(8, "#9"), top(2, "#5")}, run(1, "#4", 4, 9, 0, 264))},
		{name: "large stirrups", code: ACI31819(), brief: large, layout: layout(narrow, run(1, "#6", 2, 10, 0, 264))},
		{name: "large stirrups in a shallow beam of strong lightweight concrete", code: ACI31814(),
			brief: with(large, func(b *beam.Brief) {
				b.Section.Depth, b.Concrete.Strength = in(17), psi(11000)
				b.Concrete.Kind, b.Concrete.Density = beam.AllLightweight, units.PoundPerCubicFoot.Of(110)
			}),
			layout: layout(narrow, run(1, "#8", 2, 6, 0, 264))},
		{name: "the largest stirrups, of a low grade", code: ACI31819(), brief: with(large, func(b *beam.Brief) { b.Reinforcement.StirrupYield = psi(40000) }),
			layout: layout(narrow, run(1, "#8", 2, 9, 0, 132), run(1, "#6", 2, 9, 132, 264))},
		{name: "load on a part of the span", code: ACI31819(), brief: uneven, layout: layout(narrow, run(1, "#3", 2, 7, 6, 132), run(1, "#3", 2, 8, 136, 258))},
		{name: "load on a part of the span", code: ACI31814(), brief: uneven, layout: layout(narrow, run(1, "#3", 2, 4, 6, 64), run(1, "#3", 2, 10, 64, 258))},
		{name: "uplift, and a hung end", code: ACI31819(), brief: lifted, layout: layout([]beam.Row{bottom(3, "#8"), top(4, "#8")}, run(1, "#3", 2, 8, 10, 250))},
		{name: "demands without a moment", code: ACI31819(), brief: demandBrief(beam.Demand{Name: "A", Shear: units.Kip.Of(-30)}, beam.Demand{Name: "B", Shear: units.Kip.Of(20)}),
			layout: layout(narrow, all("#3", 2, 8)...)},
		{name: "no shear", code: ACI31814(), brief: demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(100)}), layout: layout(narrow, all("#3", 2, 8)...)},
		{name: "stirrups for strength only", code: ACI31819(), brief: demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(100), Shear: units.Kip.Of(14)}),
			layout: layout([]beam.Row{bottom(2, "#7"), top(2, "#4")}, all("#3", 2, 10)...)},
	}
}

func recordedSloping() []recorded {
	lean := func(z beam.Zone, angle float64) beam.Zone {
		return with(z, func(z *beam.Zone) { z.Angle = angle })
	}
	rows := []beam.Row{bottom(4, "#9"), top(3, "#6")}
	bent := func(count, bends int, at, angle, spacing float64, rises string) beam.BentBars {
		return beam.BentBars{Mark: "K", Bar: "#8", Count: count, Span: 1, At: in(at), Angle: angle, Rises: rises, Bends: bends, Spacing: in(spacing)}
	}
	bending := func(l beam.Layout, groups ...beam.BentBars) beam.Layout {
		l.Bent = groups
		return l
	}
	si := beam.BentBars{Mark: "K", Bar: "No. 25", Count: 2, Span: 1, At: mm(700), Angle: 45, Rises: "left", Bends: 3, Spacing: mm(220)}
	heavy := with(usBrief(), func(b *beam.Brief) { b.Loads[1].Intensity = units.KipPerFoot.Of(5) })
	return []recorded{
		{name: "inclined stirrups", code: ACI31819(), brief: heavy, layout: layout(rows, lean(run(1, "#4", 2, 8, 6, 132), 45), lean(run(1, "#4", 2, 8, 132, 258), 60))},
		{name: "inclined stirrups set too wide", code: ACI31814(), brief: heavy, layout: layout(rows, lean(run(1, "#3", 2, 14, 6, 120), 50), run(1, "#4", 2, 9, 120, 258))},
		{name: "inclined stirrups under a shear that turns", code: ACI31819(), brief: heavy, layout: layout(rows, lean(run(1, "#4", 2, 9, 0, 264), 45))},
		{name: "inclined stirrups, spacings halved", code: ACI31814(), brief: with(usBrief(), func(b *beam.Brief) { b.Loads[1].Intensity = units.KipPerFoot.Of(10) }),
			layout: layout([]beam.Row{bottom(6, "#10"), second(bottom(6, "#10")), top(5, "#10")}, lean(run(1, "#5", 2, 6, 0, 132), 60), run(1, "#5", 2, 6, 132, 264))},
		{name: "inclined stirrups for demands", code: ACI31814(),
			brief:  demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(150), Shear: units.Kip.Of(50)}, beam.Demand{Name: "B", Moment: units.KipFoot.Of(-50), Shear: units.Kip.Of(-20)}),
			layout: layout(rows, with(all("#3", 2, 8)[0], func(z *beam.Zone) { z.Angle = 60 }))},
		{name: "single bent bars", code: ACI31819(), brief: heavy,
			layout: bending(layout(rows, run(1, "#3", 2, 8, 6, 258)), bent(2, 1, 34, 45, 0, "left"), bent(2, 1, 230, 40, 0, "right"))},
		{name: "series of bent bars", code: ACI31814(), brief: heavy,
			layout: bending(layout(rows, run(1, "#3", 2, 9, 6, 258)), bent(1, 3, 30, 45, 9, "left"), bent(1, 3, 234, 30, 9, "left"))},
		{name: "bent bars too flat, and too far apart", code: ACI31819(), brief: heavy,
			layout: bending(layout(rows, run(1, "#3", 2, 9, 6, 258)), bent(1, 1, 40, 29, 0, "left"), bent(1, 2, 200, 45, 30, "right"))},
		{name: "metric series of bent bars", code: ACI31819M(), brief: siBrief(),
			layout: bending(layout([]beam.Row{bottom(4, "No. 29"), top(2, "No. 16")}, runSI(1, "No. 10", 2, 260, 150, 6850)), si)},
		{name: "metric series of bent bars", code: ACI31814M(), brief: siBrief(),
			layout: bending(layout([]beam.Row{bottom(4, "No. 29"), top(2, "No. 16")}, runSI(1, "No. 10", 2, 260, 150, 6850)), with(si, func(b *beam.BentBars) { b.Bends, b.Spacing = 1, mm(0) }))},
	}
}

func recordedHung() []recorded {
	rows := []beam.Row{bottom(4, "#9"), top(3, "#6")}
	hang := func(loads ...beam.Load) beam.Brief {
		b := usBrief()
		for _, l := range loads {
			l.Case, l.Hung = beam.Live, true
			b.Loads = append(b.Loads, l)
		}
		return b
	}
	point := func(at float64) beam.Load {
		return beam.Load{Shape: beam.PointLoad, Force: units.Kip.Of(16), At: in(at)}
	}
	wedge := beam.Load{Shape: beam.Partial, Intensity: units.KipPerFoot.Of(1), IntensityEnd: units.KipPerFoot.Of(3), Varies: true, From: in(60), To: in(120)}
	lean := with(run(1, "#4", 2, 8, 6, 132), func(z *beam.Zone) { z.Angle = 60 })
	return []recorded{
		{name: "points", code: ACI31819(), brief: hang(point(100), point(20)), layout: layout(rows, run(1, "#4", 2, 6, 6, 258))},
		{name: "points, too few stirrups", code: ACI31814(), brief: hang(point(100), point(250)), layout: layout(rows, run(1, "#3", 2, 9, 6, 90), run(1, "#3", 2, 9, 110, 258))},
		{name: "a strip, with inclined stirrups and bent bars", code: ACI31819(), brief: hang(wedge),
			layout: with(layout(rows, lean, run(1, "#4", 2, 8, 132, 258)), func(l *beam.Layout) {
				l.Bent = []beam.BentBars{{Mark: "K", Bar: "#8", Count: 2, Span: 1, At: in(70), Angle: 45, Rises: "left"}}
			})},
		{name: "a point, no stirrups", code: ACI31819(), brief: hang(point(100)), layout: layout(rows)},
		{name: "a metric floor", code: ACI31814M(), brief: with(siBrief(), func(b *beam.Brief) { b.Loads[1].Hung = true }),
			layout: layout([]beam.Row{bottom(4, "No. 29"), top(2, "No. 16")}, runSI(1, "No. 13", 2, 150, 150, 6850))},
	}
}

func recordedTorsion() []recorded {
	b, l := twistedBrief()
	side := l.Longitudinal[2]
	edited := func(name string, code Code, edit func(*beam.Brief, *beam.Layout)) recorded {
		b, l := twistedBrief()
		edit(&b, &l)
		return recorded{name: name, code: code, brief: b, layout: l}
	}
	span := func(torque float64, path beam.TorquePath, shape beam.LoadShape) beam.Brief {
		return with(usBrief(), func(s *beam.Brief) {
			s.Section, s.Cover = b.Section, b.Cover
			s.Supports[0].Kind, s.Supports[1].Kind = statics.Fixed, statics.Fixed
			l := beam.Load{Case: beam.Dead, Shape: shape, Moment: units.KipFoot.Of(torque), Path: path}
			if shape == beam.Torque {
				l.At = in(110)
			}
			s.Loads = append(s.Loads, l)
		})
	}
	rows := []beam.Row{bottom(4, "#8"), top(4, "#8"), side}
	si := with(siBrief(), func(b *beam.Brief) {
		b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.Torque, Moment: units.KilonewtonMetre.Of(60), At: mm(3500)})
	})
	rowsSI := []beam.Row{bottom(5, "No. 29"), top(3, "No. 19"), {Mark: "W", Bar: "No. 16", Count: 1, Face: beam.Side, Spacing: mm(220)}}
	tee := with(b, func(b *beam.Brief) {
		b.Section = beam.Section{Shape: beam.Tee, Width: in(16), Depth: in(28), FlangeThickness: in(6), FlangeWidth: in(60)}
	})
	return []recorded{
		edited("equilibrium", ACI31814(), func(*beam.Brief, *beam.Layout) {}),
		edited("equilibrium, too few stirrups and bars", ACI31819(), func(b *beam.Brief, l *beam.Layout) {
			l.Longitudinal, l.Transverse[0].Spacing, l.Transverse[0].Bar = l.Longitudinal[:2], in(10), "#3"
		}),
		edited("equilibrium, beyond the section", ACI31819(), func(b *beam.Brief, _ *beam.Layout) { b.Demands[0].Torque = units.KipFoot.Of(130) }),
		edited("open stirrups", ACI31814(), func(_ *beam.Brief, l *beam.Layout) { l.Transverse[0].Form = "open" }),
		edited("no stirrups", ACI31819(), func(_ *beam.Brief, l *beam.Layout) { l.Transverse = nil }),
		edited("below the threshold", ACI31819(), func(b *beam.Brief, _ *beam.Layout) { b.Demands[0].Torque = units.KipFoot.Of(5) }),
		edited("compatibility, shed", ACI31819(), func(b *beam.Brief, _ *beam.Layout) { b.Demands[0].Path = beam.CompatibilityTorque }),
		edited("diagonals at 35 degrees", ACI31819(), func(b *beam.Brief, _ *beam.Layout) { b.Readings.TorsionAngle = 35 }),
		edited("four legs under hogging and little torque", ACI31814(), func(b *beam.Brief, l *beam.Layout) {
			l.Transverse[0].Legs, b.Demands[0].Moment, b.Demands[0].Torque = 4, units.KipFoot.Of(-120), units.KipFoot.Of(15)
		}),
		edited("strong steel, lightweight concrete", ACI31814(), func(b *beam.Brief, _ *beam.Layout) {
			b.Reinforcement.Yield, b.Reinforcement.StirrupYield = psi(80000), psi(80000)
			b.Concrete.Kind, b.Concrete.Density = beam.SandLightweight, units.PoundPerCubicFoot.Of(112)
		}),
		edited("with axial tension", ACI31819(), func(b *beam.Brief, _ *beam.Layout) { b.Demands[0].Axial = units.Kip.Of(-25) }),
		edited("with axial compression", ACI31814(), func(b *beam.Brief, _ *beam.Layout) { b.Demands[0].Axial = units.Kip.Of(60) }),
		{name: "tee", code: ACI31819(), brief: tee, layout: l},
		{name: "concentrated on a span, shed", code: ACI31819(), brief: span(50, beam.CompatibilityTorque, beam.Torque), layout: layout(rows, run(1, "#4", 2, 6, 0, 264))},
		{name: "concentrated on a span", code: ACI31814(), brief: span(50, beam.EquilibriumTorque, beam.Torque),
			layout: layout(rows, run(1, "#4", 2, 6, 6, 106), run(1, "#4", 2, 9, 118, 258))},
		{name: "spread over a span", code: ACI31819(), brief: span(60, beam.EquilibriumTorque, beam.UniformTorque),
			layout: layout(rows, run(1, "#4", 2, 6, 0, 84), run(1, "#4", 2, 10, 84, 180), run(1, "#4", 2, 6, 180, 264))},
		{name: "spread over a span, the middle near a section that needs stirrups", code: ACI31819(), brief: span(60, beam.EquilibriumTorque, beam.UniformTorque),
			layout: layout(rows, run(1, "#4", 2, 6, 0, 112), run(1, "#4", 2, 9, 112, 152), run(1, "#4", 2, 6, 152, 264))},
		{name: "spread over a span, no stirrups in the middle", code: ACI31814(), brief: span(60, beam.EquilibriumTorque, beam.UniformTorque),
			layout: layout(rows, run(1, "#4", 2, 6, 0, 84), run(1, "#4", 2, 6, 180, 264))},
		{name: "metric span", code: ACI31819M(), brief: si, layout: layout(rowsSI, runSI(1, "No. 13", 2, 120, 150, 6850))},
		{name: "metric span", code: ACI31814M(), brief: si, layout: layout(rowsSI[:2], runSI(1, "No. 13", 2, 120, 0, 7000))},
	}
}

func recordedPressed() []recorded {
	heavy := with(usBrief(), func(b *beam.Brief) {
		b.Loads[0].Intensity, b.Loads[1].Intensity = units.KipPerFoot.Of(2.2), units.KipPerFoot.Of(3.6)
	})
	many := []beam.Row{bottom(4, "#10"), second(bottom(3, "#10")), relied(top(4, "#8"))}
	bundle := func(r beam.Row) beam.Row { return with(r, func(r *beam.Row) { r.Bundled = 2 }) }
	open := with(run(1, "#3", 2, 10, 90, 264), func(z *beam.Zone) { z.Form = "open" })
	si := with(siBrief(), func(b *beam.Brief) { b.Loads[1].Intensity = units.KilonewtonPerMetre.Of(45) })
	return []recorded{
		{name: "tied", code: ACI31819(), brief: heavy, layout: layout(many, run(1, "#4", 3, 8, 0, 264))},
		{name: "ties too small, too far apart and open", code: ACI31814(), brief: heavy,
			layout: layout([]beam.Row{bottom(4, "#10"), second(bottom(3, "#10")), relied(top(5, "#6")), second(top(3, "#6"))}, run(1, "#3", 2, 11, 0, 80), open)},
		{name: "a gap between ties", code: ACI31819(), brief: heavy, layout: layout(many, run(1, "#4", 2, 8, 0, 120), run(1, "#4", 2, 8, 146, 264))},
		{name: "no ties", code: ACI31814(), brief: heavy, layout: layout(many)},
		{name: "displaced concrete kept", code: ACI31819(), brief: with(heavy, func(b *beam.Brief) { b.Readings.IgnoreDisplaced = true }),
			layout: layout(many, run(1, "#4", 4, 8, 0, 264))},
		{name: "bundles", code: ACI31819(), brief: with(heavy, func(b *beam.Brief) { b.Section.Width = in(18) }),
			layout: layout([]beam.Row{bundle(bottom(6, "#9")), relied(bundle(top(4, "#8")))}, run(1, "#4", 2, 8, 0, 264))},
		{name: "bundles of large bars, in small ties", code: ACI31814(), brief: with(heavy, func(b *beam.Brief) { b.Section.Width, b.Exposure = in(20), beam.Weather }),
			layout: layout([]beam.Row{with(bundle(bottom(6, "#14")), func(r *beam.Row) { r.Bundled = 3 }), relied(bundle(top(4, "#11")))}, run(1, "#3", 2, 8, 0, 264))},
		{name: "bundles without stirrups", code: ACI31819(), brief: heavy, layout: layout([]beam.Row{bundle(bottom(4, "#9")), top(2, "#5")})},
		{name: "metric", code: ACI31819M(), brief: si,
			layout: layout([]beam.Row{bottom(4, "No. 32"), second(bottom(2, "No. 32")), relied(top(3, "No. 25"))}, runSI(1, "No. 10", 2, 140, 0, 7000))},
	}
}

func recordedDeep() []recorded {
	deep := with(usBrief(), func(b *beam.Brief) {
		b.Section.Depth, b.Section.Width = in(48), in(18)
		b.Spans[0], b.Supports[0].Kind = units.Foot.Of(40), statics.Fixed
		b.Loads[1].Intensity = units.KipPerFoot.Of(2)
	})
	counted := with(deep, func(b *beam.Brief) { b.Readings.CountSideBars = true })
	side := func(count int, spacing float64) beam.Row {
		return beam.Row{Mark: "W", Bar: "#5", Count: count, Face: beam.Side, Spacing: in(spacing)}
	}
	rows := []beam.Row{bottom(5, "#9"), second(bottom(2, "#9")), top(5, "#9")}
	stirrups := run(1, "#4", 2, 12, 0, 480)
	si := with(siBrief(), func(b *beam.Brief) { b.Section.Depth, b.Spans[0] = mm(1000), units.Metre.Of(11) })
	return []recorded{
		{name: "side bars", code: ACI31819(), brief: deep, layout: layout(append(rows[:3:3], side(3, 9.5)), stirrups)},
		{name: "no side bars", code: ACI31814(), brief: deep, layout: layout(rows, stirrups)},
		{name: "side bars counted", code: ACI31819(), brief: counted, layout: layout(append(rows[:3:3], with(side(3, 10), func(r *beam.Row) { r.Yield = psi(80000) })), stirrups)},
		{name: "metric side bars", code: ACI31814M(), brief: si,
			layout: layout([]beam.Row{bottom(4, "No. 29"), top(2, "No. 19"), {Mark: "W", Bar: "No. 13", Count: 2, Face: beam.Side, Spacing: mm(240)}}, runSI(1, "No. 13", 2, 300, 0, 11000))},
		{name: "too short for its depth", code: ACI31819(), brief: with(deep, func(b *beam.Brief) { b.Spans[0] = units.Foot.Of(16) }), layout: layout(rows, run(1, "#4", 2, 12, 0, 192))},
		{name: "a load close to the support", code: ACI31814(), brief: with(deep, func(b *beam.Brief) {
			b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(60), At: in(70)})
		}), layout: layout(rows, stirrups)},
	}
}

func recordedQueries() []recorded {
	ask := func(name string, code Code, q beam.SectionQuery, edit func(*beam.SectionQuery)) recorded {
		q.Layers = append([]beam.SteelLayer(nil), q.Layers...)
		if q.Stirrups != nil {
			s := *q.Stirrups
			q.Stirrups = &s
		}
		if edit != nil {
			edit(&q)
		}
		return recorded{name: name, code: code, query: &q}
	}
	bent := func(q *beam.SectionQuery, angle, spacing float64) {
		q.Bent = &beam.BentSteel{Area: in2(0.79), Yield: psi(60000), Angle: angle, Spacing: in(spacing)}
	}
	var list []recorded
	for _, code := range Editions() {
		list = append(list, ask("rectangle", code, query(), nil), ask("torsion", code, twistedQuery(), nil),
			ask("tee, hogging, no stirrups", code, teeQuery(), func(q *beam.SectionQuery) {
				q.Bending, q.Demand = beam.Negative, beam.Demand{Name: "1", Moment: units.KipFoot.Of(-80), Shear: units.Kip.Of(18)}
			}))
	}
	return append(list,
		ask("nothing asked", ACI31819(), query(), func(q *beam.SectionQuery) { q.Demand = beam.Demand{} }),
		ask("inclined stirrups and bent bars", ACI31819(), query(), func(q *beam.SectionQuery) { q.Stirrups.Angle = 60; bent(q, 45, 0) }),
		ask("flat stirrups and a series of bent bars", ACI31814(), query(), func(q *beam.SectionQuery) { q.Stirrups.Angle = 40; bent(q, 30, 8) }),
		ask("stirrups and bent bars too far apart", ACI31819(), query(), func(q *beam.SectionQuery) { q.Stirrups.Spacing = in(14); bent(q, 45, 25) }),
		ask("bent bars too flat", ACI31814(), query(), func(q *beam.SectionQuery) { bent(q, 25, 0); q.Demand.Shear = units.Kip.Of(150) }),
		ask("detailed", ACI31814(), query(), func(q *beam.SectionQuery) { q.Readings.ShearMethod = beam.DetailedShear }),
		ask("compression", ACI31819(), query(), func(q *beam.SectionQuery) { q.Demand.Axial = units.Kip.Of(120) }),
		ask("tension", ACI31814(), query(), func(q *beam.SectionQuery) { q.Demand.Axial = units.Kip.Of(-60) }),
		ask("compression beyond scope", ACI31814(), query(), func(q *beam.SectionQuery) { q.Demand.Axial = units.Kip.Of(250) }),
		ask("hollow, twisted", ACI31819(), twistedQuery(), func(q *beam.SectionQuery) {
			q.Section = boxSection()
			q.Layers[0].Depth, q.Stirrups.Area = in(33.5), in2(0.62)
		}),
		ask("torsion, open stirrups", ACI31819(), twistedQuery(), func(q *beam.SectionQuery) { q.Stirrups.Open = true }),
		ask("torsion, shed", ACI31814(), twistedQuery(), func(q *beam.SectionQuery) {
			q.Demand.Path, q.Demand.Torque, q.Readings.TorsionAngle = beam.CompatibilityTorque, units.KipFoot.Of(60), 40
		}),
		ask("torsion, too little of everything", ACI31819(), twistedQuery(), func(q *beam.SectionQuery) {
			q.Demand.Torque, q.Layers, q.Stirrups.Spacing = units.KipFoot.Of(90), q.Layers[:1], in(11)
		}),
		ask("torsion below the threshold, four legs", ACI31814(), twistedQuery(), func(q *beam.SectionQuery) {
			q.Demand.Torque, q.Stirrups.Legs = units.KipFoot.Of(5), 4
		}),
		ask("torsion, no stirrups", ACI31819(), twistedQuery(), func(q *beam.SectionQuery) { q.Stirrups = nil }),
		ask("joist", ACI31819(), query(), func(q *beam.SectionQuery) {
			q.Section = beam.Section{Shape: beam.Tee, Width: in(5), Depth: in(18), FlangeThickness: in(3), FlangeWidth: in(35), Joist: true}
			q.Layers, q.Stirrups = []beam.SteelLayer{{Area: in2(0.88), Depth: in(16.5), Yield: psi(60000)}}, nil
			q.Demand = beam.Demand{Name: "1", Moment: units.KipFoot.Of(20), Shear: units.Kip.Of(6)}
		}),
		ask("fibres", ACI31814(), query(), func(q *beam.SectionQuery) {
			q.Concrete.Fibres, q.Stirrups, q.Section.Depth, q.Layers[0].Depth = true, nil, in(22), in(19.5)
		}),
	)
}
