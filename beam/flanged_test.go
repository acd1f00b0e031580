package beam_test

import (
	"context"
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// hogging is a cantilever tee, its flange in tension, of an invented beam.
func hogging() beam.Brief {
	b := plain()
	b.Section = beam.Section{Shape: beam.Tee, Width: units.Inch.Of(14), Depth: units.Inch.Of(26), FlangeThickness: units.Inch.Of(6), FlangeWidth: units.Inch.Of(54)}
	b.Spans = []units.Length{units.Foot.Of(12)}
	b.Supports = []beam.Support{{Kind: statics.Fixed, Width: units.Inch.Of(12)}, {Kind: statics.Free}}
	return b
}

// rowsOf is a layout of bars in the web at top and bottom, with more rows.
func rowsOf(more ...beam.Row) beam.Layout {
	return beam.Layout{
		Longitudinal: append([]beam.Row{
			{Mark: "B1", Bar: "#6", Count: 2, Face: beam.Bottom, Layer: 1},
			{Mark: "T1", Bar: "#7", Count: 3, Face: beam.Top, Layer: 1},
		}, more...),
		Transverse: []beam.Zone{{Mark: "S1", Bar: "#4", Legs: 2, Spacing: units.Inch.Of(8), From: units.Inch.Of(6), To: units.Foot.Of(12), Form: "closed"}},
	}
}

func checked(t *testing.T, b beam.Brief, l beam.Layout) *beam.Result {
	t.Helper()
	r, err := beam.CheckLayout(context.Background(), aci318.ACI31819(), b, l)
	require.NoError(t, err)
	return r
}

// Bars beside the web stand at their spacing outward from the outermost bars
// of the web, an odd one more on the left, at the level of the first layer:
// coordinates by hand. The web begins 20 in from the left end of the flange; a
// #7 seated in a #4 stirrup of 1.5 in cover stands 1.5 + 0.5 + 1.0 in from its
// side.
func TestBarsBesideTheWeb(t *testing.T) {
	r := checked(t, hogging(), rowsOf(
		beam.Row{Mark: "T2", Bar: "#5", Count: 3, Face: beam.Top, Flange: true, Spacing: units.Inch.Of(6)},
		beam.Row{Mark: "T3", Bar: "#4", Count: 2, Face: beam.Top, Flange: true, Spacing: units.Inch.Of(5)},
	))
	at := map[string][][2]float64{}
	for _, bar := range r.Bars {
		if bar.Face == beam.Top {
			at[bar.Mark] = append(at[bar.Mark], [2]float64{bar.X.In(units.Inch), bar.Y.In(units.Inch)})
		}
	}
	near := func(want, got [][2]float64) {
		t.Helper()
		require.Len(t, got, len(want))
		for i := range want {
			require.InDelta(t, want[i][0], got[i][0], 1e-9)
			require.InDelta(t, want[i][1], got[i][1], 1e-9)
		}
	}
	near([][2]float64{{23, 26 - 2.4375}, {27, 26 - 2.4375}, {31, 26 - 2.4375}}, at["T1"])
	near([][2]float64{{11, 26 - 2.3125}, {17, 26 - 2.3125}, {37, 26 - 2.3125}}, at["T2"])
	near([][2]float64{{6, 26 - 2.25}, {42, 26 - 2.25}}, at["T3"])

	// 24.3.4 spreads tension steel over a tenth of the clear span of 138 in, which
	// is no wider than the web: what lies beside it does not count here.
	area, d := 3*0.60, 26-2.4375
	require.InDelta(t, area, r.Flexure[0].TensionSteel.In(units.SquareInch), 1e-9)
	require.InDelta(t, d, r.Flexure[0].EffectiveDepth.In(units.Inch), 1e-9)
}

// All bars beside the web of an ell stand on its one side.
func TestBarsBesideTheWebOfAnEll(t *testing.T) {
	b := hogging()
	b.Section.Shape = beam.Ell
	r := checked(t, b, rowsOf(beam.Row{Mark: "T2", Bar: "#5", Count: 2, Face: beam.Top, Flange: true, Spacing: units.Inch.Of(6)}))
	var x []float64
	for _, bar := range r.Bars {
		if bar.Mark == "T2" {
			x = append(x, bar.X.In(units.Inch))
		}
	}
	require.InDeltaSlice(t, []float64{11 + 6, 11 + 12}, x, 1e-9)
}

// A bar beside the web keeps the stirrups' cover to the edge of the flange and
// to its soffit.
func TestBarsMustLieInsideTheFlange(t *testing.T) {
	at := func(spacing, thickness float64) map[string]beam.Outcome {
		b := hogging()
		b.Section.FlangeThickness = units.Inch.Of(thickness)
		r := checked(t, b, rowsOf(beam.Row{Mark: "T2", Bar: "#6", Count: 2, Face: beam.Top, Flange: true, Spacing: units.Inch.Of(spacing)}))
		out := map[string]beam.Outcome{}
		for i := range r.Checks {
			out[r.Checks[i].ID] = r.Checks[i].Outcome
		}
		return out
	}
	// 20 in of overhang, 3 in to the bar in the web, 0.375 + 1.5 in to the edge.
	require.Equal(t, beam.Pass, at(20+3-1.875, 6)["fit.flange"])
	require.Equal(t, beam.Fail, at(20+3-1.874, 6)["fit.flange"])
	// 2.0 in to the bar, 0.75 in of it, 1.5 in below.
	require.Equal(t, beam.Pass, at(8, 4.25)["fit.flange-thickness"])
	require.Equal(t, beam.Fail, at(8, 4.24)["fit.flange-thickness"])
}

func TestFaultsOfRows(t *testing.T) {
	row := beam.Row{Mark: "X", Bar: "#6", Count: 4, Face: beam.Top, Layer: 1}
	flange := row
	flange.Flange, flange.Layer, flange.Spacing = true, 0, units.Inch.Of(6)
	bent := beam.BentBars{Bar: "#6", Count: 2, At: units.Foot.Of(2), Angle: 45, Rises: "left"}
	tests := []struct {
		name string
		edit func(b *beam.Brief, l *beam.Layout)
		path string
	}{
		{"bundles that do not divide", func(_ *beam.Brief, l *beam.Layout) { r := row; r.Bundled = 3; l.Longitudinal[1] = r }, "/layout/longitudinal/1/bundled"},
		{"five in a bundle", func(_ *beam.Brief, l *beam.Layout) { r := row; r.Count, r.Bundled = 10, 5; l.Longitudinal[1] = r }, "/layout/longitudinal/1/bundled"},
		{"soft bars", func(_ *beam.Brief, l *beam.Layout) { l.Longitudinal[0].Yield = units.PSI.Of(60) }, "/layout/longitudinal/0/yield"},
		{"two grades of one size in a layer", func(_ *beam.Brief, l *beam.Layout) {
			r := l.Longitudinal[1]
			r.Yield = units.KSI.Of(80)
			l.Longitudinal = append(l.Longitudinal, r)
		}, "/layout/longitudinal"},
		{"no flange there", func(_ *beam.Brief, l *beam.Layout) {
			r := flange
			r.Face = beam.Bottom
			l.Longitudinal = append(l.Longitudinal, r)
		}, "/layout/longitudinal/2/flange"},
		{"no spacing in the flange", func(_ *beam.Brief, l *beam.Layout) {
			r := flange
			r.Spacing = units.Length{}
			l.Longitudinal = append(l.Longitudinal, r)
		}, "/layout/longitudinal/2/spacing"},
		{"bundles in the flange", func(_ *beam.Brief, l *beam.Layout) {
			r := flange
			r.Bundled = 2
			l.Longitudinal = append(l.Longitudinal, r)
		}, "/layout/longitudinal/2"},
		{"bars in the flange alone", func(_ *beam.Brief, l *beam.Layout) { l.Longitudinal[1] = flange }, "/layout/longitudinal"},
		{"bent: unknown bar", func(_ *beam.Brief, l *beam.Layout) { x := bent; x.Bar = "#77"; l.Bent = append(l.Bent, x) }, "/layout/bent/0/bar"},
		{"bent: no bars", func(_ *beam.Brief, l *beam.Layout) { x := bent; x.Count = 0; l.Bent = append(l.Bent, x) }, "/layout/bent/0/count"},
		{"bent: flat", func(_ *beam.Brief, l *beam.Layout) { x := bent; x.Angle = 14.9; l.Bent = append(l.Bent, x) }, "/layout/bent/0/angle"},
		{"bent: beyond upright", func(_ *beam.Brief, l *beam.Layout) { x := bent; x.Angle = 90.1; l.Bent = append(l.Bent, x) }, "/layout/bent/0/angle"},
		{"bent: rises nowhere", func(_ *beam.Brief, l *beam.Layout) { x := bent; x.Rises = "up"; l.Bent = append(l.Bent, x) }, "/layout/bent/0/rises"},
		{"bent: groups without a spacing", func(_ *beam.Brief, l *beam.Layout) { x := bent; x.Bends = 2; l.Bent = append(l.Bent, x) }, "/layout/bent/0/spacing"},
		{"bent: beyond the span", func(_ *beam.Brief, l *beam.Layout) {
			x := bent
			x.At = units.Foot.Of(13)
			l.Bent = append(l.Bent, x)
		}, "/layout/bent/0/at"},
		{"bent: another span", func(_ *beam.Brief, l *beam.Layout) { x := bent; x.Span = 2; l.Bent = append(l.Bent, x) }, "/layout/bent/0/span"},
		{"bent: with demands", func(b *beam.Brief, l *beam.Layout) {
			b.Spans, b.Supports, b.Loads = nil, nil, nil
			b.Demands = []beam.Demand{{Name: "d", Moment: units.KipFoot.Of(-50)}}
			l.Transverse[0].From, l.Transverse[0].To = units.Length{}, units.Length{}
			l.Bent = append(l.Bent, bent)
		}, "/layout/bent/0"},
		{"stirrups lying down", func(_ *beam.Brief, l *beam.Layout) { l.Transverse[0].Angle = 10 }, "/layout/transverse/0/angle"},
	}
	for _, tt := range tests {
		t.Run(tt.name, func(t *testing.T) {
			b, l := hogging(), rowsOf()
			tt.edit(&b, &l)
			_, err := beam.CheckLayout(context.Background(), aci318.ACI31819(), b, l)
			var wrong *beam.InputError
			require.ErrorAs(t, err, &wrong)
			require.Equal(t, tt.path, wrong.Faults[0].Path, "%v", err)
			require.NotEmpty(t, wrong.Faults[0].Detail)
		})
	}
}

func TestFaultsOfFlangedSections(t *testing.T) {
	slab := beam.Slab{ClearLeft: units.Foot.Of(6), ClearRight: units.Foot.Of(6)}
	tests := []struct {
		name string
		edit func(b *beam.Brief)
		path string
	}{
		{"no web", func(b *beam.Brief) { b.Section.Width = units.Length{} }, "/section/web_width"},
		{"no flange thickness", func(b *beam.Brief) { b.Section.FlangeThickness = units.Length{} }, "/section/flange_thickness"},
		{"a flange as deep as the beam", func(b *beam.Brief) { b.Section.FlangeThickness = b.Section.Depth }, "/section/flange_thickness"},
		{"a flange narrower than the web", func(b *beam.Brief) { b.Section.FlangeWidth = units.Inch.Of(13) }, "/section/flange_width"},
		{"no flange width", func(b *beam.Brief) { b.Section.FlangeWidth = units.Length{} }, "/section/flange_width"},
		{"width and slab", func(b *beam.Brief) { b.Section.Slab = slab }, "/section/slab"},
		{"a tee with a slab on one side", func(b *beam.Brief) {
			b.Section.FlangeWidth, b.Section.Slab = units.Length{}, beam.Slab{ClearLeft: slab.ClearLeft}
		}, "/section/slab"},
		{"an ell with a slab on both", func(b *beam.Brief) {
			b.Section.Shape, b.Section.FlangeWidth, b.Section.Slab = beam.Ell, units.Length{}, slab
		}, "/section/slab"},
		{"a negative clear distance", func(b *beam.Brief) {
			b.Section.FlangeWidth, b.Section.Slab = units.Length{}, beam.Slab{ClearLeft: slab.ClearLeft.Neg(), ClearRight: slab.ClearRight}
		}, "/section/slab/clear_left"},
		{"a slab under an inverted tee", func(b *beam.Brief) { b.Section.Shape, b.Section.Slab = beam.InvertedTee, slab }, "/section/slab"},
		{"a slab and no span", func(b *beam.Brief) {
			b.Section.FlangeWidth, b.Section.Slab = units.Length{}, slab
			b.Spans, b.Supports, b.Loads, b.Demands = nil, nil, nil, []beam.Demand{{Moment: units.KipFoot.Of(9)}}
		}, "/section/slab"},
		{"alone in a slab", func(b *beam.Brief) {
			b.Section.FlangeWidth, b.Section.Slab, b.Section.Isolated = units.Length{}, slab, true
		}, "/section/isolated"},
		{"an ell of its own", func(b *beam.Brief) { b.Section.Shape, b.Section.Isolated = beam.Ell, true }, "/section/isolated"},
		{"a rectangle with a flange", func(b *beam.Brief) { b.Section.Shape = beam.Rectangular }, "/section/flange_thickness"},
		{"a tee with an outline", func(b *beam.Brief) { b.Section.Outline = outline(0, 0, 1, 0, 1, 1) }, "/section/outline"},
		{"a polygon with a width", func(b *beam.Brief) {
			b.Section = beam.Section{Shape: beam.Polygon, Width: mm(300), Outline: outline(0, 0, 300, 0, 300, 500, 0, 500)}
		}, "/section/width"},
		{"a polygon with depths to try", func(b *beam.Brief) {
			b.Section = beam.Section{Shape: beam.Polygon, Outline: outline(0, 0, 300, 0, 300, 500, 0, 500)}
			b.Preferences.Depths = []units.Length{mm(600)}
		}, "/preferences/depths"},
		{"a polygon of two corners", func(b *beam.Brief) {
			b.Section = beam.Section{Shape: beam.Polygon, Outline: outline(0, 0, 300, 0)}
		}, "/section/outline"},
		{"no such path", func(b *beam.Brief) {
			b.Loads = append(b.Loads, beam.Load{Case: beam.Dead, Shape: beam.Torque, Moment: units.KipFoot.Of(1), Path: 7})
		}, "/loads/2/path"},
		{"flat diagonals", func(b *beam.Brief) { b.Readings.TorsionAngle = 9 }, "/torsion_angle"},
		{"a share beyond all of it", func(b *beam.Brief) { b.Concrete.Kind, b.Concrete.Normal = beam.FineBlend, 1.1 }, "/concrete/normal_share"},
		{"a share of no blend", func(b *beam.Brief) { b.Concrete.Normal = 0.5 }, "/concrete/normal_share"},
		{"splitting strength of normalweight", func(b *beam.Brief) { b.Concrete.Splitting = units.PSI.Of(400) }, "/concrete/splitting"},
		{"five in a bundle", func(b *beam.Brief) { b.Preferences.Bundles = 5 }, "/preferences/bundles"},
	}
	for _, tt := range tests {
		t.Run(tt.name, func(t *testing.T) {
			b := hogging()
			tt.edit(&b)
			err := beam.Validate(aci318.ACI31819(), b)
			var wrong *beam.InputError
			require.ErrorAs(t, err, &wrong)
			paths := make([]string, len(wrong.Faults))
			for i, f := range wrong.Faults {
				paths[i] = f.Path
				require.NotEmpty(t, f.Detail)
			}
			require.Contains(t, paths, tt.path)
		})
	}
}

// Bundles keep their bars together, real bars by coordinates, as units of the
// steel of the face.
func TestBundlesInALayout(t *testing.T) {
	b := plain()
	l := rowsOf(beam.Row{Mark: "B2", Bar: "#8", Count: 4, Bundled: 2, Face: beam.Bottom, Layer: 2})
	l.Longitudinal[0] = beam.Row{Mark: "B1", Bar: "#8", Count: 6, Bundled: 2, Face: beam.Bottom, Layer: 1}
	l.Transverse[0].To = units.Foot.Of(21.5)
	r := checked(t, b, l)
	count := map[string]int{}
	for _, bar := range r.Bars {
		count[bar.Mark+" "+bar.Bar]++
	}
	require.Equal(t, map[string]int{"B1 #8": 6, "B2 #8": 4, "T1 #7": 3}, count)
	require.InDelta(t, 10*0.79, r.Flexure[0].TensionSteel.In(units.SquareInch), 1e-9)
}

// The search proposes bundles only where they are allowed, and says so in the
// rows.
func TestSearchOfBundles(t *testing.T) {
	b := plain()
	b.Loads[1].Intensity = units.KipPerFoot.Of(2.6)
	b.Section.Depth = units.Inch.Of(28)
	b.Preferences.Bars, b.Preferences.MaxLayers = []string{"#7"}, 1
	require.Equal(t, beam.Unsatisfied, design(t, b).Verdict)
	b.Preferences.Bundles = 2
	r := design(t, b)
	require.Equal(t, beam.Satisfied, r.Verdict, failures(r))
	row := r.Layout.Longitudinal[0]
	require.Equal(t, 2, row.Bundled)
	require.Equal(t, "#7", row.Bar)
	require.Zero(t, row.Count%2)
	again := checked(t, b, r.Layout)
	require.Equal(t, r.Checks, again.Checks)
}

// A bar bent at 45 degrees crosses the 24 in beam between the levels 1.5 + 0.5 +
// 0.375 in from both faces: 19.25 in of rise, the root of two times that of
// bar. The legs of a stirrup at 45 degrees are longer by as much, between the
// centre lines of its level sides, 24 - 2 1.5 - 0.5 in apart.
func TestScheduleOfInclinedSteel(t *testing.T) {
	b := plain()
	l := rowsOf()
	l.Transverse[0].To = units.Foot.Of(21.5)
	upright := checked(t, b, l)
	l.Transverse[0].Angle = 45
	l.Bent = []beam.BentBars{{Mark: "D1", Bar: "#6", Count: 2, At: units.Foot.Of(2), Angle: 45, Rises: "left", Bends: 3, Spacing: units.Inch.Of(9)}}
	r := checked(t, b, l)
	last := r.Schedule[len(r.Schedule)-1]
	require.Equal(t, "D1", last.Mark)
	require.Equal(t, 6, last.Count)
	require.InEpsilon(t, 19.25*math.Sqrt2, last.Length.In(units.Inch), 1e-9)
	longer := r.Schedule[2].Length.Sub(upright.Schedule[2].Length)
	require.InEpsilon(t, 2*20.5*(math.Sqrt2-1), longer.In(units.Inch), 1e-9)
	require.True(t, upright.Quantities.SteelMass.Less(r.Quantities.SteelMass))
}

// Steel of a flange in tension is found in the web and beside it, as evenly as
// equal masses allow, and within the width that 24.3.4 spreads it over: a tenth
// of the clear span of 30 ft less 14 in.
func TestSearchOfSteelBesideTheWeb(t *testing.T) {
	b := hogging()
	b.Spans[0] = units.Foot.Of(30)
	b.Supports[0].Width = units.Inch.Of(14)
	b.Supports[1] = b.Supports[0]
	b.Loads[0].Intensity, b.Loads[1].Intensity = units.KipPerFoot.Of(1.5), units.KipPerFoot.Of(1.5)
	r := design(t, b)
	require.Equal(t, beam.Satisfied, r.Verdict, failures(r))
	var web, flange []float64
	for _, bar := range r.Bars {
		switch x := bar.X.In(units.Inch) - 27; { // from the middle of the web
		case bar.Face != beam.Top:
		case x < -7 || x > 7:
			flange = append(flange, x)
		default:
			web = append(web, x)
		}
	}
	require.NotEmpty(t, flange)
	require.Zero(t, len(flange)%2)
	for _, x := range flange {
		require.LessOrEqual(t, math.Abs(x), (360-14)/20.0+1e-9)
	}
	require.Greater(t, len(web), 2)
	require.Equal(t, r.Checks, checked(t, b, r.Layout).Checks)
}

// A wide top that no moment bends still needs bars close enough for a torque
// (ACI 318-19 9.7.5.1): the search adds a third one to the box.
func TestSearchSpacesBarsForTorque(t *testing.T) {
	b := plain()
	b.Section = beam.Section{Shape: beam.Polygon, Outline: inches(0, 0, 24, 0, 24, 30, 0, 30), Voids: [][]beam.Point{inches(7, 7, 17, 7, 17, 23, 7, 23)}}
	b.Spans[0] = units.Foot.Of(27)
	b.Loads = append(b.Loads, beam.Load{Case: beam.Dead, Shape: beam.Torque, At: units.Foot.Of(13.5), Moment: units.KipFoot.Of(40)})
	r := design(t, b)
	require.Equal(t, beam.Satisfied, r.Verdict, failures(r))
	top := 0
	for _, bar := range r.Bars {
		if bar.Face == beam.Top {
			top++
		}
	}
	require.GreaterOrEqual(t, top, 3)
}

// outcomes are those of of the checks with an id.
func outcomes(r *beam.Result, id string) (out []beam.Outcome) {
	for i := range r.Checks {
		if r.Checks[i].ID == id {
			out = append(out, r.Checks[i].Outcome)
		}
	}
	return out
}

// Bars that a layout calls bars of the flange stand clear of the web.
func TestFlangeBarsStandBesideTheWeb(t *testing.T) {
	at := func(spacing float64) []beam.Outcome {
		r := checked(t, hogging(), rowsOf(beam.Row{Mark: "T2", Bar: "#6", Count: 2, Face: beam.Top, Flange: true, Spacing: units.Inch.Of(spacing)}))
		return outcomes(r, "fit.beside-web")
	}
	require.Equal(t, []beam.Outcome{beam.Pass}, at(3+0.375))
	require.Equal(t, []beam.Outcome{beam.Fail}, at(3+0.374))
}

// Bars beyond mid-depth are no steel of their face.
func TestBarsLieInTheirHalf(t *testing.T) {
	l := rowsOf()
	l.Transverse[0].To = units.Foot.Of(21.5)
	for layer := 2; layer <= 6; layer++ {
		l.Longitudinal = append(l.Longitudinal, beam.Row{Mark: "B2", Bar: "#6", Count: 2, Face: beam.Bottom, Layer: layer})
	}
	require.Equal(t, []beam.Outcome{beam.Pass, beam.Pass}, outcomes(checked(t, plain(), l), "fit.half"))
	l.Longitudinal = append(l.Longitudinal, beam.Row{Mark: "B3", Bar: "#6", Count: 2, Face: beam.Bottom, Layer: 7})
	require.Equal(t, []beam.Outcome{beam.Fail, beam.Pass}, outcomes(checked(t, plain(), l), "fit.half"))
}

// Legs between the outer two stand in concrete, side bars in the walls; the
// search keeps to that.
func TestSteelStandsClearOfHollows(t *testing.T) {
	b := plain()
	b.Section = beam.Section{Shape: beam.Polygon, Outline: inches(0, 0, 40, 0, 40, 36, 0, 36), Voids: [][]beam.Point{inches(8, 8, 32, 8, 32, 28, 8, 28)}}
	b.Spans, b.Supports, b.Loads = nil, nil, nil
	b.Demands = []beam.Demand{{Name: "a", Moment: units.KipFoot.Of(600), Shear: units.Kip.Of(110)}}
	l := beam.Layout{
		Longitudinal: []beam.Row{
			{Mark: "B1", Bar: "#8", Count: 8, Face: beam.Bottom, Layer: 1},
			{Mark: "T1", Bar: "#6", Count: 8, Face: beam.Top, Layer: 1},
			{Mark: "F1", Bar: "#5", Count: 2, Face: beam.Side, Spacing: units.Inch.Of(9)},
		},
		Transverse: []beam.Zone{{Mark: "S1", Bar: "#3", Legs: 4, Spacing: units.Inch.Of(10), Form: "closed"}},
	}
	require.Equal(t, []beam.Outcome{beam.Fail}, outcomes(checked(t, b, l), "stirrup.hollow"))
	l.Transverse[0].Legs = 2
	require.Empty(t, outcomes(checked(t, b, l), "stirrup.hollow"))
	require.Equal(t, beam.Pass, outcomes(checked(t, b, l), "fit.hollow")[0])
	// 2 × 1.5 + 0.375 + 5 in would leave nothing of a wall of 8 in.
	l.Longitudinal[2].Bar = "#18"
	l.Longitudinal[2].Count = 1
	b.Cover = units.Inch.Of(2.7)
	require.Equal(t, beam.Fail, outcomes(checked(t, b, l), "fit.hollow")[0], "2 × 2.7 + 0.375 + 2.257 in of an 8 in wall")
	b.Cover = units.Length{}
	r := design(t, b)
	for _, z := range r.Layout.Transverse {
		require.Equal(t, 2, z.Legs)
	}

	// Between two hollows there is room for a leg.
	b.Section.Voids = [][]beam.Point{inches(7, 8, 17, 8, 17, 28, 7, 28), inches(23, 8, 33, 8, 33, 28, 23, 28)}
	l.Longitudinal[2].Bar, l.Transverse[0].Legs = "#5", 3
	require.Equal(t, []beam.Outcome{beam.Pass}, outcomes(checked(t, b, l), "stirrup.hollow"))
}

// Side bars have the yield strength of their own row.
func TestSideBarsOfAnotherGrade(t *testing.T) {
	b := plain()
	b.Readings.CountSideBars = true
	l := rowsOf(beam.Row{Mark: "F1", Bar: "#5", Count: 2, Face: beam.Side, Spacing: units.Inch.Of(6)})
	l.Transverse[0].To = units.Foot.Of(21.5)
	full := checked(t, b, l).Flexure[0].Nominal
	l.Longitudinal[2].Yield = units.KSI.Of(40)
	soft := checked(t, b, l).Flexure[0].Nominal
	require.True(t, soft.Less(full))
	l.Longitudinal[2].Yield = units.PSI.Of(60)
	_, err := beam.CheckLayout(context.Background(), aci318.ACI31819(), b, l)
	require.ErrorContains(t, err, "/layout/longitudinal/2/yield")
}

// A brief as resolved, its flange found from the slab, can be given again.
func TestResolvedBriefsAreBriefs(t *testing.T) {
	b := hogging()
	b.Section.FlangeWidth, b.Section.Slab = units.Length{}, beam.Slab{ClearLeft: units.Foot.Of(6), ClearRight: units.Foot.Of(7)}
	r := design(t, b)
	again := design(t, r.Problem.Brief)
	require.Equal(t, r.Section, again.Section)
	require.Equal(t, r.Verdict, again.Verdict)
}

// inches makes points of pairs of inches.
func inches(xy ...float64) (out []beam.Point) {
	for i := 0; i < len(xy); i += 2 {
		out = append(out, beam.Point{X: units.Inch.Of(xy[i]), Y: units.Inch.Of(xy[i+1])})
	}
	return out
}

// Loads are refused what belongs to loads of other shapes, which they would
// otherwise be thought to carry.
func TestForeignFieldsOfLoads(t *testing.T) {
	w, f, m := units.KipPerFoot.Of(1), units.Kip.Of(1), units.KipFoot.Of(1)
	ft := units.Foot.Of(1)
	tests := []struct {
		load beam.Load
		path string
	}{
		{beam.Load{Shape: beam.UniformTorque, Intensity: w}, "intensity"},
		{beam.Load{Shape: beam.PointLoad, Intensity: w}, "intensity"},
		{beam.Load{Shape: beam.Uniform, Intensity: w, Force: f}, "force"},
		{beam.Load{Shape: beam.Uniform, Intensity: w, Moment: m}, "moment"},
		{beam.Load{Shape: beam.Uniform, Intensity: w, At: ft}, "at"},
		{beam.Load{Shape: beam.Uniform, Intensity: w, From: ft}, "from"},
		{beam.Load{Shape: beam.PointLoad, Force: f, To: ft}, "to"},
		{beam.Load{Shape: beam.Uniform, Intensity: w, IntensityEnd: w}, "intensity_end"},
		{beam.Load{Shape: beam.Uniform, Intensity: w, Varies: true}, "intensity_end"},
		{beam.Load{Shape: beam.Couple, Moment: m, Path: beam.EquilibriumTorque}, "path"},
	}
	for _, tt := range tests {
		b := plain()
		tt.load.Case = beam.Dead
		b.Loads = append(b.Loads, tt.load)
		var wrong *beam.InputError
		require.ErrorAs(t, beam.Validate(aci318.ACI31819(), b), &wrong, "%s", tt.path)
		require.Len(t, wrong.Faults, 1)
		require.Equal(t, "/loads/2/"+tt.path, wrong.Faults[0].Path)
	}
}

// A support's torque is what the span brings to it: 1.4 times half of 30 kip-ft
// at each end of a span held at both.
func TestReactionsHoldTorques(t *testing.T) {
	b := plain()
	b.Loads = append(b.Loads, beam.Load{Case: beam.Dead, Shape: beam.UniformTorque, Moment: units.KipFoot.Of(-30)})
	r := design(t, b)
	for _, s := range r.Reactions {
		require.InEpsilon(t, 1.4*15, s.Torque.In(units.KipFoot), 1e-9)
		require.Equal(t, "1.4D", s.TorqueBy)
	}
}

// A section that is too small for its torque is given up soon, with what would
// cure it.
func TestHopelessTorqueIsGivenUpSoon(t *testing.T) {
	b := plain()
	b.Loads = append(b.Loads, beam.Load{Case: beam.Dead, Shape: beam.UniformTorque, Moment: units.KipFoot.Of(400)})
	r := design(t, b)
	require.Equal(t, beam.Unsatisfied, r.Verdict)
	require.Contains(t, r.Binding, "torsion.section")
	require.Less(t, len(r.Rejected), 2000)
	require.NotEmpty(t, r.Cures)
}

// A bundle counts as a thicker bar than a single one that asks for more cover:
// in weather No. 6 bars need 2 in (ACI 318-19 Table 20.5.1.3.1), bundles of No. 5
// bars 1.5 in. Both lie in the same stirrups.
func TestCoverOfSinglesBesideBundles(t *testing.T) {
	b := plain()
	b.Exposure = beam.Weather
	l := rowsOf()
	l.Transverse[0].To = units.Foot.Of(21.5)
	l.Transverse[0].Bar = "#3"
	l.Longitudinal[1] = beam.Row{Mark: "T1", Bar: "#5", Count: 4, Bundled: 2, Face: beam.Top, Layer: 1}
	require.InDelta(t, 2-0.375, checked(t, b, l).Cover.In(units.Inch), 1e-9)
}
