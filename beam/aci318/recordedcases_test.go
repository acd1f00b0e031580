package aci318

import (
	"slices"

	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// Briefs and layouts of our own for the recorded calculations, good and bad.

// siBrief is a rectangle of 350 by 600 mm over 7 m.
func siBrief() beam.Brief {
	b := usBrief()
	b.Section = beam.Section{Shape: beam.Rectangular, Width: mm(350), Depth: mm(600)}
	b.Concrete.Strength = units.Megapascal.Of(30)
	b.Reinforcement = beam.Reinforcement{Catalog: "astm-metric", Yield: units.Megapascal.Of(420)}
	b.Spans = []units.Length{units.Metre.Of(7)}
	b.Supports = []beam.Support{{Kind: statics.Pinned, Width: mm(300)}, {Kind: statics.Roller, Width: mm(300)}}
	b.Loads = []beam.Load{
		{Case: beam.Dead, Shape: beam.Uniform, Intensity: units.KilonewtonPerMetre.Of(18)},
		{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KilonewtonPerMetre.Of(25)},
	}
	return b
}

// run is stirrups at a spacing along a span, in inches.
func run(span int, bar string, legs int, spacing, from, to float64) beam.Zone {
	return beam.Zone{Mark: "S", Span: span, Bar: bar, Legs: legs, Spacing: in(spacing), From: in(from), To: in(to), Form: "closed"}
}

// runSI is the same in millimetres.
func runSI(span int, bar string, legs int, spacing, from, to float64) beam.Zone {
	return beam.Zone{Mark: "S", Span: span, Bar: bar, Legs: legs, Spacing: mm(spacing), From: mm(from), To: mm(to), Form: "closed"}
}

// all is stirrups for demands.
func all(bar string, legs int, spacing float64) []beam.Zone {
	return []beam.Zone{{Mark: "S", Bar: bar, Legs: legs, Spacing: in(spacing), Form: "closed"}}
}

// with is a value edited, or a brief of its own.
func with[T any](v T, edit func(*T)) T {
	if b, ok := any(&v).(*beam.Brief); ok {
		b.Spans, b.Supports = slices.Clone(b.Spans), slices.Clone(b.Supports)
		b.Loads, b.Demands = slices.Clone(b.Loads), slices.Clone(b.Demands)
	}
	edit(&v)
	return v
}

func relied(r beam.Row) beam.Row { return with(r, func(r *beam.Row) { r.InCompression = true }) }

func second(r beam.Row) beam.Row { return with(r, func(r *beam.Row) { r.Layer = 2 }) }

func layout(rows []beam.Row, zones ...beam.Zone) beam.Layout {
	return beam.Layout{Longitudinal: rows, Transverse: zones}
}

func recordedRectangles() []recorded {
	rows := []beam.Row{bottom(4, "#9"), top(2, "#5")}
	rowsSI := []beam.Row{bottom(4, "No. 29"), second(bottom(2, "No. 22")), top(2, "No. 16")}
	heavy := with(usBrief(), func(b *beam.Brief) {
		b.Loads[0].Intensity, b.Loads[1].Intensity = units.KipPerFoot.Of(3), units.KipPerFoot.Of(6)
	})
	propped := with(usBrief(), func(b *beam.Brief) {
		b.Supports = []beam.Support{{Kind: statics.Fixed, Width: in(16)}, {Kind: statics.Roller, Width: in(14)}}
		b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(18), At: in(140)},
			beam.Load{Case: beam.Wind, Shape: beam.Couple, Moment: units.KipFoot.Of(20), At: in(120)})
		b.Serviceability.Attached, b.Braced = beam.Fragile, units.Foot.Of(12)
	})
	hogging := []beam.Row{bottom(4, "#8"), top(5, "#8")}
	weather := with(siBrief(), func(b *beam.Brief) {
		b.Exposure, b.Concrete.Aggregate, b.Braced = beam.Weather, mm(40), units.Metre.Of(20)
		b.Readings.RoundedYield, b.Readings.TuckedCorner = true, true
	})
	return []recorded{
		{name: "simple span, three zones", code: ACI31819(), brief: usBrief(),
			layout: layout(rows, run(1, "#3", 2, 7, 6, 62), run(1, "#3", 2, 10, 62, 202), run(1, "#3", 2, 7, 202, 258))},
		{name: "simple span, a zone too wide and a gap", code: ACI31814(), brief: usBrief(),
			layout: layout([]beam.Row{bottom(3, "#7"), top(2, "#4")}, run(1, "#3", 2, 14, 14, 84), run(1, "#4", 4, 9, 91, 190), run(1, "#3", 2, 6, 216, 258))},
		{name: "simple span, beyond what the section may carry", code: ACI31819(), brief: heavy,
			layout: layout(rows, run(1, "#4", 2, 4, 0, 264))},
		{name: "simple span, no stirrups", code: ACI31814(), brief: usBrief(), layout: layout(rows)},
		{name: "simple span, no stirrups", code: ACI31819(), brief: usBrief(), layout: layout(rows)},
		{name: "fixed at one end", code: ACI31819(), brief: propped,
			layout: layout(hogging, run(1, "#3", 2, 8, 8, 120), run(1, "#3", 4, 9, 120, 257))},
		{name: "fixed at one end", code: ACI31814(), brief: propped,
			layout: layout(hogging, run(1, "#3", 2, 10, 0, 264))},
		{name: "metric span in weather, two layers", code: ACI31819M(), brief: weather,
			layout: layout(rowsSI, runSI(1, "No. 10", 2, 200, 150, 2150), runSI(1, "No. 10", 2, 250, 2150, 4850), runSI(1, "No. 10", 2, 200, 4850, 6850))},
		{name: "metric span, crowded bars and little cover", code: ACI31814M(),
			brief:  with(siBrief(), func(b *beam.Brief) { b.Cover, b.Concrete.Aggregate = mm(25), mm(25) }),
			layout: layout([]beam.Row{bottom(7, "No. 25"), second(bottom(3, "No. 25")), top(2, "No. 10")}, runSI(1, "No. 10", 2, 270, 0, 7000))},
		{name: "span against ground, large bars with less cover than theirs", code: ACI31814(),
			brief:  with(usBrief(), func(b *beam.Brief) { b.Exposure, b.Reinforcement.Coating = beam.Ground, beam.Epoxy }),
			layout: layout([]beam.Row{bottom(3, "#11"), top(2, "#6")}, run(1, "#4", 2, 8, 0, 264))},
		{name: "shallow span", code: ACI31819(),
			brief:  with(usBrief(), func(b *beam.Brief) { b.Section.Depth, b.Braced = in(15), units.Foot.Of(60) }),
			layout: layout([]beam.Row{bottom(5, "#10"), top(2, "#5")}, run(1, "#3", 2, 5, 0, 264))},
	}
}

func recordedConcretes() []recorded {
	rows := []beam.Row{bottom(4, "#8"), top(2, "#5")}
	shears := func(edit func(*beam.Brief), forces ...[2]float64) beam.Brief {
		b := demandBrief()
		for i, f := range forces {
			b.Demands = append(b.Demands, beam.Demand{Name: string(rune('A' + i)), Moment: units.KipFoot.Of(f[0]), Shear: units.Kip.Of(f[1])})
		}
		edit(&b)
		return b
	}
	kind := func(k beam.ConcreteKind, edit func(*beam.Concrete)) beam.Brief {
		return shears(func(b *beam.Brief) {
			b.Concrete.Kind, b.Concrete.Density = k, units.PoundPerCubicFoot.Of(112)
			if edit != nil {
				edit(&b.Concrete)
			}
		}, [2]float64{120, 30})
	}
	detailed := func(b *beam.Brief) { b.Readings.ShearMethod = beam.DetailedShear }
	strong := func(b *beam.Brief) { b.Concrete.Strength = psi(12000) }
	rowA := func(b *beam.Brief) { b.Readings.ShearRow = beam.RowA }
	rowB := func(b *beam.Brief) { b.Readings.ShearRow = beam.RowB }
	return []recorded{
		{name: "sand-lightweight", code: ACI31814(), brief: kind(beam.SandLightweight, nil), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "sand-lightweight, density not given", faulty: true, code: ACI31819(), brief: kind(beam.SandLightweight, func(c *beam.Concrete) { c.Density = units.Density{} }), layout: layout(rows)},
		{name: "normalweight, too light", faulty: true, code: ACI31814(), brief: kind(beam.Normalweight, nil), layout: layout(rows)},
		{name: "all-lightweight of 100 pcf", code: ACI31819(), brief: kind(beam.AllLightweight, func(c *beam.Concrete) { c.Density = units.PoundPerCubicFoot.Of(100) }), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "sand-lightweight of 120 pcf", code: ACI31819(), brief: kind(beam.SandLightweight, func(c *beam.Concrete) { c.Density = units.PoundPerCubicFoot.Of(120) }), layout: layout(rows)},
		{name: "fine blend", code: ACI31814(), brief: kind(beam.FineBlend, func(c *beam.Concrete) { c.Normal = 0.4 }), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "coarse blend", code: ACI31814(), brief: kind(beam.CoarseBlend, func(c *beam.Concrete) { c.Normal = 0.3 }), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "splitting strength", code: ACI31814(), brief: kind(beam.AllLightweight, func(c *beam.Concrete) { c.Splitting = psi(370) }), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "splitting strength, of no account", code: ACI31819(), brief: kind(beam.AllLightweight, func(c *beam.Concrete) { c.Splitting = psi(370) }), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "fibres", code: ACI31819(), brief: shears(func(b *beam.Brief) { b.Concrete.Fibres = true }, [2]float64{90, 15}), layout: layout(rows)},
		{name: "fibres, too much shear", code: ACI31814(), brief: shears(func(b *beam.Brief) { b.Concrete.Fibres = true }, [2]float64{90, 35}), layout: layout(rows)},
		{name: "shallow", code: ACI31819(), brief: shears(func(b *beam.Brief) { b.Section.Depth = in(10) }, [2]float64{30, 9}), layout: layout(rows)},
		{name: "strong, fewer than the least stirrups", code: ACI31819(), brief: shears(strong, [2]float64{150, 30}), layout: layout(rows, all("#3", 2, 10.5)...)},
		{name: "strong, least stirrups", code: ACI31819(), brief: shears(strong, [2]float64{150, 60}), layout: layout(rows, all("#3", 4, 8)...)},
		{name: "strong", code: ACI31814(), brief: shears(strong, [2]float64{150, 60}, [2]float64{-20, -30}), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "row (a) asked for", code: ACI31819(), brief: shears(rowA, [2]float64{150, 40}), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "row (b) asked for", code: ACI31819(), brief: shears(rowB, [2]float64{150, 40}), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "much steel: the cap", code: ACI31819(), brief: shears(func(b *beam.Brief) { b.Section.Width = in(10) }, [2]float64{60, 40}),
			layout: layout([]beam.Row{bottom(4, "#11"), second(bottom(4, "#11")), top(2, "#5")}, all("#3", 2, 8)...)},
		{name: "detailed, row (a)", code: ACI31814(), brief: shears(detailed, [2]float64{170, 20}), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "detailed, row (b)", code: ACI31814(), brief: shears(detailed, [2]float64{20, 40}, [2]float64{0, 30}), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "detailed, row (c)", code: ACI31814(), brief: shears(func(b *beam.Brief) { detailed(b); b.Section.Width = in(7) }, [2]float64{10, 30}),
			layout: layout([]beam.Row{bottom(2, "#11"), second(bottom(2, "#11")), top(2, "#5")}, all("#3", 2, 8)...)},
		{name: "detailed along a metric span", code: ACI31814M(),
			brief: with(siBrief(), func(b *beam.Brief) { b.Readings.ShearMethod = beam.DetailedShear }),
			layout: layout([]beam.Row{bottom(4, "No. 29"), top(2, "No. 16")}, runSI(1, "No. 10", 2, 160, 150, 2150),
				runSI(1, "No. 10", 2, 250, 2150, 4850), runSI(1, "No. 10", 2, 160, 4850, 6850))},
		{name: "metric lightweight by density", code: ACI31819M(),
			brief: with(siBrief(), func(b *beam.Brief) {
				b.Concrete.Kind, b.Concrete.Density = beam.SandLightweight, units.KilogramPerCubicMetre.Of(1840)
			}),
			layout: layout([]beam.Row{bottom(4, "No. 29"), top(2, "No. 16")}, runSI(1, "No. 10", 2, 140, 0, 7000))},
		{name: "metric, strong, no stirrups", code: ACI31814M(),
			brief: with(siBrief(), func(b *beam.Brief) {
				b.Concrete.Strength, b.Spans, b.Supports, b.Loads = units.Megapascal.Of(80), nil, nil, nil
				b.Demands = []beam.Demand{{Name: "A", Moment: units.KilonewtonMetre.Of(150), Shear: units.Kilonewton.Of(90)}}
			}),
			layout: layout([]beam.Row{bottom(4, "No. 29"), top(2, "No. 16")})},
		{name: "metric, no stirrups", code: ACI31819M(),
			brief: with(siBrief(), func(b *beam.Brief) {
				b.Spans, b.Supports, b.Loads = nil, nil, nil
				b.Demands = []beam.Demand{{Name: "A", Moment: units.KilonewtonMetre.Of(150), Shear: units.Kilonewton.Of(90)}}
			}),
			layout: layout([]beam.Row{bottom(4, "No. 29"), top(2, "No. 16")})},
		{name: "grades mixed", code: ACI31819(),
			brief: shears(func(b *beam.Brief) { b.Reinforcement.StirrupYield = psi(80000) }, [2]float64{190, 60}),
			layout: layout([]beam.Row{
				bottom(3, "#8"), with(second(bottom(2, "#6")), func(r *beam.Row) { r.Yield = psi(80000) }), with(top(2, "#5"), func(r *beam.Row) { r.Yield = psi(40000) }),
			}, all("#4", 2, 8)...)},
		{name: "a grade below those of the standard", code: ACI31814(), brief: shears(func(*beam.Brief) {}, [2]float64{50, 20}),
			layout: layout([]beam.Row{with(bottom(4, "#8"), func(r *beam.Row) { r.Yield = psi(33000) }), top(2, "#5")}, all("#3", 2, 8)...)},
		{name: "strength below the least", code: ACI31819(), brief: shears(func(b *beam.Brief) { b.Concrete.Strength = psi(2400) }, [2]float64{50, 20}),
			layout: layout(rows)},
	}
}

func recordedFlanges() []recorded {
	web := []beam.Row{bottom(2, "#5"), top(4, "#8")}
	spread := append(web[:2:2], flangeRow(beam.Top, 2, "#8", 7), flangeRow(beam.Top, 2, "#4", 6))
	fixed := with(hoggingTee(24, 48), func(b *beam.Brief) {
		b.Section.FlangeWidth, b.Section.Slab = units.Length{}, beam.Slab{ClearLeft: units.Foot.Of(9), ClearRight: units.Foot.Of(7)}
		b.Supports[1] = beam.Support{Kind: statics.Fixed, Width: in(12)}
		b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1.5)})
	})
	ell := with(siBrief(), func(b *beam.Brief) {
		b.Section = beam.Section{Shape: beam.Ell, Width: mm(350), Depth: mm(600), FlangeThickness: mm(120), Slab: beam.Slab{ClearRight: units.Metre.Of(3)}}
		b.Supports[0].Kind = statics.Fixed
	})
	one := beam.Row{Mark: "F", Bar: "No. 16", Count: 2, Face: beam.Top, Layer: 1, Flange: true, Spacing: mm(170)}
	lone := with(hoggingTee(20, 24), func(b *beam.Brief) { b.Section.Isolated, b.Section.FlangeThickness = true, in(8) })
	return []recorded{
		{name: "cantilever, its flange in tension, steel spread", code: ACI31819(), brief: hoggingTee(20, 60), layout: layout(spread, run(1, "#3", 2, 8, 0, 246))},
		{name: "cantilever, all steel in the web", code: ACI31814(), brief: hoggingTee(20, 60), layout: layout(web, run(1, "#3", 2, 10, 6, 120))},
		{name: "fixed ends with a slab", code: ACI31819(), brief: fixed, layout: layout(append([]beam.Row{bottom(3, "#8")}, spread[1:]...), run(1, "#3", 2, 9, 0, 294))},
		{name: "fixed ends with a slab", code: ACI31814(), brief: fixed, layout: layout([]beam.Row{bottom(3, "#8"), top(4, "#8")}, run(1, "#3", 2, 9, 0, 294))},
		{name: "ell with a slab", code: ACI31819M(), brief: ell,
			layout: layout([]beam.Row{bottom(4, "No. 25"), top(4, "No. 25"), one}, runSI(1, "No. 10", 2, 200, 150, 6850))},
		{name: "ell with a slab, no bars beside the web", code: ACI31814M(), brief: ell,
			layout: layout([]beam.Row{bottom(4, "No. 25"), top(2, "No. 25")}, runSI(1, "No. 10", 2, 280, 150, 6850))},
		{name: "isolated tee", code: ACI31819(), brief: lone, layout: layout(append(web[:2:2], flangeRow(beam.Top, 1, "#8", 7)), run(1, "#3", 2, 9, 0, 246))},
		{name: "isolated tee, its flange too thin", code: ACI31814(), brief: with(lone, func(b *beam.Brief) { b.Section.FlangeThickness = in(4) }),
			layout: layout(web, run(1, "#3", 2, 9, 0, 246))},
		{name: "isolated tee, its flange too wide", code: ACI31819(), brief: with(lone, func(b *beam.Brief) { b.Section.FlangeWidth = in(60) }),
			layout: layout(web, run(1, "#3", 2, 9, 0, 246))},
	}
}

// square is the corners of a rectangle, in inches.
func square(left, low, right, high float64) []beam.Point {
	return []beam.Point{{X: in(left), Y: in(low)}, {X: in(right), Y: in(low)}, {X: in(right), Y: in(high)}, {X: in(left), Y: in(high)}}
}

// boxSection is 24 by 36 in. with walls of 6 in.
func boxSection() beam.Section {
	return beam.Section{Shape: beam.Polygon, Outline: square(0, 0, 24, 36), Voids: [][]beam.Point{square(6, 6, 18, 30)}}
}

func recordedShapes() []recorded {
	demand := func(s beam.Section, d ...beam.Demand) beam.Brief {
		b := demandBrief(d...)
		b.Section = s
		return b
	}
	bend := beam.Demand{Name: "A", Moment: units.KipFoot.Of(140), Shear: units.Kip.Of(30)}
	back := beam.Demand{Name: "B", Moment: units.KipFoot.Of(-40), Shear: units.Kip.Of(-20)}
	taper := polygonOf([2]float64{6, 0}, [2]float64{18, 0}, [2]float64{24, 24}, [2]float64{0, 24})
	ledges := with(usBrief(), func(b *beam.Brief) {
		b.Section = beam.Section{Shape: beam.InvertedTee, Width: in(14), Depth: in(28), FlangeThickness: in(8), FlangeWidth: in(30)}
		b.Loads[1].Hung = true
	})
	side := beam.Row{Mark: "W", Bar: "#5", Count: 2, Face: beam.Side, Spacing: in(10)}
	return []recorded{
		{name: "tapered", code: ACI31819(), brief: demand(taper, bend, back), layout: layout([]beam.Row{bottom(4, "#8"), top(2, "#6")}, all("#3", 2, 8)...)},
		{name: "tapered, few bars", code: ACI31814(), brief: demand(taper, bend, back), layout: layout([]beam.Row{bottom(2, "#6"), top(2, "#4")}, all("#3", 2, 12)...)},
		{name: "inverted tee with hung floor", code: ACI31819(), brief: ledges,
			layout: layout([]beam.Row{bottom(4, "#9"), top(2, "#5")}, run(1, "#4", 2, 6, 0, 264))},
		{name: "inverted tee with hung floor, too few stirrups", code: ACI31814(), brief: ledges,
			layout: layout([]beam.Row{bottom(4, "#9"), top(2, "#5")}, run(1, "#3", 2, 9, 0, 264))},
		{name: "box under torque", code: ACI31819(),
			brief:  demand(boxSection(), beam.Demand{Name: "A", Moment: units.KipFoot.Of(200), Shear: units.Kip.Of(40), Torque: units.KipFoot.Of(60)}),
			layout: layout([]beam.Row{bottom(6, "#8"), top(4, "#6"), side}, all("#5", 2, 5)...)},
		{name: "box under torque, thin walls", code: ACI31814(),
			brief: demand(with(boxSection(), func(s *beam.Section) { s.Voids = [][]beam.Point{square(3, 3, 21, 33)} }),
				beam.Demand{Name: "A", Moment: units.KipFoot.Of(200), Shear: units.Kip.Of(40), Torque: units.KipFoot.Of(90)}),
			layout: layout([]beam.Row{bottom(4, "#8"), top(2, "#6")}, all("#4", 4, 12)...)},
		{name: "box without torque", code: ACI31819(), brief: demand(boxSection(), bend), layout: layout([]beam.Row{bottom(5, "#8"), top(3, "#6")}, all("#4", 2, 9)...)},
	}
}

func recordedJoists() []recorded {
	rows := []beam.Row{bottom(2, "#6"), top(2, "#4")}
	bad := func(s *beam.Section) {
		s.Width, s.FlangeThickness, s.Slab = in(3.9), in(2), beam.Slab{ClearLeft: in(31), ClearRight: in(30)}
	}
	by := func(width, thickness float64) func(*beam.Section) {
		return func(s *beam.Section) {
			s.Slab, s.FlangeWidth, s.FlangeThickness = beam.Slab{}, in(width), in(thickness)
		}
	}
	return []recorded{
		{name: "joist without stirrups", code: ACI31819(), brief: joistBrief(nil), layout: layout(rows)},
		{name: "joist without stirrups", code: ACI31814(), brief: joistBrief(nil), layout: layout(rows)},
		{name: "joist with stirrups", code: ACI31819(), brief: joistBrief(nil), layout: layout(rows, run(1, "#3", 2, 7, 0, 264))},
		{name: "beyond the limits of joists", code: ACI31819(), brief: joistBrief(bad), layout: layout(rows)},
		{name: "joist with a flange by its width", code: ACI31814(), brief: joistBrief(by(35, 3)), layout: layout(rows)},
		{name: "joist with a flange too wide and too thin", code: ACI31819(), brief: joistBrief(by(36, 2)), layout: layout(rows)},
		{name: "detailed joist", code: ACI31814(), brief: with(joistBrief(nil), func(b *beam.Brief) { b.Readings.ShearMethod = beam.DetailedShear }), layout: layout(rows)},
		{name: "beam with a slab, by Table 9.6.3.1", code: ACI31819(),
			brief:  joistBrief(func(s *beam.Section) { s.Joist, s.Width, s.FlangeThickness = false, in(12), in(8) }),
			layout: layout(rows)},
	}
}

func recordedAxialForces() []recorded {
	rows := []beam.Row{bottom(4, "#8"), top(3, "#6")}
	axial := func(moment, shear float64, axial ...float64) beam.Brief {
		b := demandBrief()
		for i, n := range axial {
			b.Demands = append(b.Demands, beam.Demand{Name: string(rune('A' + i)), Moment: units.KipFoot.Of(moment), Shear: units.Kip.Of(shear), Axial: units.Kip.Of(n)})
		}
		return b
	}
	si := with(siBrief(), func(b *beam.Brief) {
		b.Spans, b.Supports, b.Loads = nil, nil, nil
		b.Demands = []beam.Demand{{Name: "A", Moment: units.KilonewtonMetre.Of(220), Shear: units.Kilonewton.Of(110), Axial: units.Kilonewton.Of(-150)},
			{Name: "B", Moment: units.KilonewtonMetre.Of(-90), Shear: units.Kilonewton.Of(150), Axial: units.Kilonewton.Of(300)}}
	})
	rowsSI := []beam.Row{bottom(4, "No. 25"), top(3, "No. 22")}
	return []recorded{
		{name: "compression", code: ACI31814(), brief: axial(150, 40, 80), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "compression", code: ACI31819(), brief: axial(150, 40, 80), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "compression at its cap", code: ACI31819(), brief: axial(150, 30, 130), layout: layout(rows)},
		{name: "compression beyond scope", code: ACI31819(), brief: axial(150, 30, 135), layout: layout(rows)},
		{name: "tension", code: ACI31814(), brief: axial(100, 30, -30, -60), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "tension", code: ACI31819(), brief: axial(100, 30, -30, -60), layout: layout(rows)},
		{name: "tension that leaves no concrete strength", code: ACI31819(), brief: axial(-20, 30, -250), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "tension that leaves no concrete strength", code: ACI31814(), brief: axial(20, 30, -180), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "tension alone", code: ACI31819(), brief: axial(0, 0, -80), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "tension beyond the steel", code: ACI31814(), brief: axial(0, 10, -250), layout: layout(rows, all("#3", 2, 8)...)},
		{name: "both", code: ACI31814M(), brief: si, layout: layout(rowsSI, beam.Zone{Mark: "S", Bar: "No. 10", Legs: 2, Spacing: mm(200), Form: "closed"})},
		{name: "both", code: ACI31819M(), brief: si, layout: layout(rowsSI, beam.Zone{Mark: "S", Bar: "No. 10", Legs: 2, Spacing: mm(200), Form: "closed"})},
	}
}
