package briefs

import (
	"math"

	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// breakScope makes a sound brief break a rule of scope.
func (m *maker) breakScope(b *beam.Brief) {
	member := len(b.Spans) > 0
	switch r := m.IntN(9); {
	case r == 0:
		b.Concrete.Strength = m.stress(m.either(2400, 16))
	case r == 1:
		b.Reinforcement.Yield = m.stress(m.either(120000, 800))
	case r == 2:
		b.Reinforcement.Yield = m.stress(m.either(33000, 230))
	case r == 3:
		b.Reinforcement.Catalog = pick(m, "en-10080", "csa-g30-18", "as-nzs-4671")
		b.Preferences.Bars, b.Preferences.Stirrups = nil, nil
	case r == 4 && member:
		b.Spans[0] = m.length(m.depth * m.between(0.8, 1.9))
		b.Loads = b.Loads[:0]
		b.Supports[0].Width, b.Supports[1].Width = units.Length{}, units.Length{}
		b.NoSelfWeight = false
	case r == 5 && member:
		b.Loads = append(b.Loads, beam.Load{
			Case: beam.Live, Shape: beam.PointLoad, Force: m.forceOf(m.either(10e3, 40e3)),
			At: m.length(m.depth * m.between(1.1, 1.8)).Min(b.Spans[0].Scale(0.9)),
		})
	case !member:
		b.Demands[0].Axial = m.forceOf(m.fc * m.area * m.between(0.12, 0.4))
	default:
		b.Preferences.Stirrups = []string{"#9"}
		if b.Reinforcement.Catalog == "astm-metric" {
			b.Preferences.Stirrups = []string{"No. 29"}
		}
	}
}

// torque is about the greatest that may be neglected.
func (m *maker) torque() float64 {
	area := m.width * m.depth
	return 0.75 * m.either(1, 0.083) * math.Sqrt(m.fc) * area * area / (2 * (m.width + m.depth))
}

// spoil puts something absurd into a brief.
func (m *maker) spoil(b *beam.Brief) {
	odd := pick(m, math.NaN(), math.Inf(1), math.Inf(-1), 0, -1, 1e300, -1e300, 1e-300, 5e-324, math.MaxFloat64)
	member := len(b.Spans) > 0
	switch r := m.IntN(28); {
	case r == 0:
		b.Section.Width = units.Metre.Of(odd)
	case r == 1:
		b.Section.Depth = units.Metre.Of(odd)
	case r == 2:
		b.Concrete.Strength = units.Pascal.Of(odd)
	case r == 3:
		b.Reinforcement.Yield = units.Pascal.Of(odd)
	case r == 4:
		b.Reinforcement.StirrupYield = units.Pascal.Of(odd)
	case r == 5:
		b.Concrete.Density = units.KilogramPerCubicMetre.Of(odd)
	case r == 6:
		b.Concrete.Aggregate = units.Metre.Of(odd)
	case r == 7:
		b.Cover = units.Metre.Of(odd)
	case r == 8:
		b.Reinforcement.Catalog = pick(m, "", "astm-inches", "ASTM-INCH", "bars")
	case r == 9:
		b.Section.Shape = beam.Shape(pick(m, 0, 9, 255))
	case r == 10:
		b.Exposure = beam.Exposure(pick(m, 0, 77))
		b.Cover = units.Length{}
	case r == 11:
		b.Preferences.Bars = []string{pick(m, "#2", "", "8", "#8 ", "No. 99")}
	case r == 12:
		b.Preferences.MaxLayers = pick(m, -1, 5, 1<<40)
	case r == 13:
		b.Preferences.MaxLegs = pick(m, -2, 1, 99)
	case r == 14:
		b.Preferences.SpacingBy = units.Metre.Of(odd)
	case r == 15:
		b.Preferences.Depths = []units.Length{units.Metre.Of(odd)}
	case r == 16:
		b.Demands = append(b.Demands, beam.Demand{Name: "x", Moment: units.NewtonMetre.Of(odd), Shear: units.Newton.Of(odd)})
	case r == 17:
		b.Concrete.Kind = beam.SandLightweight
		b.Concrete.Density = units.Density{}
	case r == 18:
		b.Braced = units.Metre.Of(odd)
	case r == 19:
		b.Serviceability.Months = pick(m, -1, 1<<40)
	case r == 20:
		b.Readings.ShearRow, b.Readings.ShearMethod = beam.ShearRow(m.IntN(256)), beam.ShearMethod(m.IntN(256))
	case r == 21:
		b.Preferences.Prefer = beam.Preference(pick(m, 6, 7, 255))
	case r == 22:
		m.spoilSection(&b.Section, odd)
	case r == 23:
		b.Readings.TorsionAngle = pick(m, odd, 29, 61, 90)
		if b.Readings.TorsionAngle == 0 {
			b.Readings.TorsionAngle = -45
		}
	case r == 24:
		b.Concrete.Kind, b.Concrete.Normal = beam.FineBlend, pick(m, math.NaN(), 1.1, -0.1)
	case !member:
		b.Demands[0].Torque = units.NewtonMetre.Of(odd)
	case r == 25:
		pick(m,
			func() { b.Spans[0] = units.Metre.Of(odd) },
			func() { b.Spans = nil },
			func() { b.Spans = append(b.Spans, b.Spans[0]) },
			func() { b.Supports = b.Supports[:1] },
			func() { b.Supports[0].Kind = statics.SupportKind(77) },
			func() { b.Supports[0].Kind, b.Supports[1].Kind = statics.Free, statics.Free },
			func() { b.Supports[0].Kind, b.Supports[1].Kind = statics.Pinned, statics.Free },
			func() { b.Supports[1].Width = units.Metre.Of(odd) },
		)()
	default:
		l := beam.Load{Case: beam.Live, Shape: beam.Uniform, Intensity: units.NewtonPerMetre.Of(odd)}
		pick(m,
			func() {},
			func() { l.Case = beam.LoadCase(pick(m, 0, 8, 255)) },
			func() { l.Shape = beam.LoadShape(pick(m, 0, 7, 255)) },
			func() { l.Shape, l.Force, l.At = beam.PointLoad, units.Newton.Of(odd), units.Metre.Of(odd) },
			func() { l.Shape, l.From, l.To = beam.Partial, units.Metre.Of(odd), b.Spans[0] },
			func() { l.Intensity, l.Sustained = units.LineLoad{}, odd },
			func() { l.Intensity, l.Span = units.LineLoad{}, pick(m, -1, 2, 1<<40) },
			func() { l.Shape, l.Moment = beam.Torque, units.NewtonMetre.Of(odd) },
		)()
		b.Loads = append(b.Loads, l)
	}
}

// spoilSection makes an outline that no beam has.
func (m *maker) spoilSection(s *beam.Section, odd float64) {
	box := func(x, y, w, h float64) []beam.Point {
		return m.points([]float64{x, y, x + w, y, x + w, y + h, x, y + h})
	}
	w, h := m.width, m.depth
	polygon := beam.Section{Shape: beam.Polygon, Outline: box(0, 0, w, h)}
	switch m.IntN(11) {
	case 0:
		s.Outline = polygon.Outline[:2]
		s.Shape = beam.Polygon
	case 1: // crosses itself
		polygon.Outline[1], polygon.Outline[2] = polygon.Outline[2], polygon.Outline[1]
		*s = polygon
	case 2: // a hollow that reaches out
		polygon.Voids = [][]beam.Point{box(0.3*w, 0.3*h, w, h)}
		*s = polygon
	case 3: // a hollow without an area
		polygon.Voids = [][]beam.Point{box(0.3*w, 0.3*h, 0, 0.3*h)}
		*s = polygon
	case 4: // nothing stands upright all the way
		*s = beam.Section{Shape: beam.Polygon, Outline: m.points([]float64{0, 0, w, 0, 4 * w, h, 3 * w, h})}
	case 5:
		polygon.Outline[0].X = units.Metre.Of(pick(m, math.NaN(), math.Inf(1), 1e300))
		*s = polygon
	case 6:
		*s = polygon
		s.Width = m.length(w)
	case 7:
		*s = beam.Section{Shape: beam.Tee, Width: m.length(w), Depth: m.length(h), FlangeThickness: m.length(h), FlangeWidth: m.length(2 * w)}
	case 8:
		*s = beam.Section{Shape: beam.InvertedTee, Width: m.length(w), Depth: m.length(h), FlangeThickness: m.length(h / 4), FlangeWidth: m.length(w / 2)}
	case 9:
		*s = beam.Section{Shape: beam.Tee, Width: m.length(w), Depth: m.length(h), FlangeThickness: units.Metre.Of(odd), FlangeWidth: m.length(2 * w)}
	default:
		*s = beam.Section{Shape: beam.Ell, Width: m.length(w), Depth: m.length(h), FlangeThickness: m.length(h / 4), Slab: beam.Slab{ClearLeft: m.length(w), ClearRight: m.length(w)}}
	}
}
