package beam_test

import (
	"math"
	"slices"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

func mm(x float64) units.Length { return units.Millimetre.Of(x) }

// outline makes points of pairs of millimetres.
func outline(xy ...float64) []beam.Point {
	var out []beam.Point
	for i := 0; i < len(xy); i += 2 {
		out = append(out, beam.Point{X: mm(xy[i]), Y: mm(xy[i+1])})
	}
	return out
}

func measured(t *testing.T, s beam.Section) (beam.Geometry, beam.Section) {
	t.Helper()
	g, faults := beam.GeometryOf(&s)
	require.Empty(t, faults)
	return g, s
}

func inMillimetres(g *beam.Geometry) map[string]float64 {
	return map[string]float64{
		"Ag": g.Gross.In(units.SquareMillimetre), "Acp": g.Enclosed.In(units.SquareMillimetre),
		"pcp": g.Perimeter.In(units.Millimetre), "form": g.Form.In(units.Millimetre),
		"bw": g.Web.In(units.Millimetre), "left": g.WebLeft.In(units.Millimetre), "overall": g.Overall.In(units.Millimetre),
		"top": g.TopWidth.In(units.Millimetre), "bottom": g.BottomWidth.In(units.Millimetre),
		"side wall": g.SideWall.In(units.Millimetre), "top wall": g.TopWall.In(units.Millimetre), "bottom wall": g.BottomWall.In(units.Millimetre),
	}
}

// Areas and perimeters by elementary geometry.
func TestGeometryOfEveryShape(t *testing.T) {
	tee := beam.Section{Shape: beam.Tee, Width: mm(300), Depth: mm(600), FlangeThickness: mm(120), FlangeWidth: mm(1100)}
	ell, inverted := tee, tee
	ell.Shape, inverted.Shape = beam.Ell, beam.InvertedTee
	tests := []struct {
		name         string
		section      beam.Section
		want         map[string]float64
		width, depth float64
	}{
		{"rectangle", beam.Section{Shape: beam.Rectangular, Width: mm(300), Depth: mm(600)}, map[string]float64{
			"Ag": 180000, "Acp": 180000, "pcp": 1800, "form": 1500, "bw": 300, "left": 0, "overall": 300, "top": 300, "bottom": 300,
		}, 300, 600},
		{"tee", tee, map[string]float64{
			"Ag": 180000 + 800*120, "Acp": 276000, "pcp": 2 * (1100 + 600), "form": 2300, "bw": 300, "left": 400, "overall": 1100, "top": 1100, "bottom": 300,
		}, 300, 600},
		{"ell, its flange on the right", ell, map[string]float64{
			"Ag": 276000, "Acp": 276000, "pcp": 3400, "form": 2300, "bw": 300, "left": 0, "overall": 1100, "top": 1100, "bottom": 300,
		}, 300, 600},
		{"inverted tee", inverted, map[string]float64{
			"Ag": 276000, "Acp": 276000, "pcp": 3400, "form": 3100, "bw": 300, "left": 400, "overall": 1100, "top": 300, "bottom": 1100,
		}, 300, 600},
		{"tee drawn as a polygon, clockwise from anywhere", beam.Section{Shape: beam.Polygon, Outline: outline(
			-50, 600, 1050, 600, 1050, 480, 650, 480, 650, 0, 350, 0, 350, 480, -50, 480)}, map[string]float64{
			"Ag": 276000, "Acp": 276000, "pcp": 3400, "form": 2300, "bw": 300, "left": 400, "overall": 1100, "top": 1100, "bottom": 300,
		}, 300, 600},
		{"tapering web", beam.Section{Shape: beam.Polygon, Outline: outline(50, 0, 350, 0, 400, 500, 0, 500)}, map[string]float64{
			"Ag": 175000, "Acp": 175000, "pcp": 700 + 2*math.Hypot(50, 500), "form": 300 + 2*math.Hypot(50, 500), "bw": 300, "left": 50, "overall": 400, "top": 400, "bottom": 300,
		}, 300, 500},
		{"box", beam.Section{Shape: beam.Polygon, Outline: outline(0, 0, 800, 0, 800, 1000, 0, 1000), Voids: [][]beam.Point{
			outline(150, 200, 650, 200, 650, 820, 150, 820)}}, map[string]float64{
			"Ag": 800000 - 500*620, "Acp": 800000, "pcp": 3600, "form": 2800, "bw": 300, "left": 0, "overall": 800, "top": 800, "bottom": 800,
			"side wall": 150, "top wall": 180, "bottom wall": 200,
		}, 800, 1000},
		{"two voids", beam.Section{Shape: beam.Polygon, Outline: outline(0, 0, 1000, 0, 1000, 700, 0, 700), Voids: [][]beam.Point{
			outline(120, 150, 440, 150, 440, 550, 120, 550), outline(560, 150, 560, 550, 900, 550, 900, 150)}}, map[string]float64{
			"Ag": 700000 - 320*400 - 340*400, "Acp": 700000, "pcp": 3400, "form": 2400, "bw": 340, "left": 0, "overall": 1000, "top": 1000, "bottom": 1000,
			"side wall": 100, "top wall": 150, "bottom wall": 150,
		}, 1000, 700},
	}
	for _, tt := range tests {
		t.Run(tt.name, func(t *testing.T) {
			g, s := measured(t, tt.section)
			got := inMillimetres(&g)
			for what, v := range got {
				require.InDelta(t, tt.want[what], v, 1e-6, what)
			}
			require.InDelta(t, tt.width, s.Width.In(units.Millimetre), 1e-9)
			require.InDelta(t, tt.depth, s.Depth.In(units.Millimetre), 1e-9)
			require.Equal(t, len(tt.section.Voids) > 0, g.Hollow)
			gross, err := mechanics.Section{Parts: g.Parts}.Gross()
			require.NoError(t, err, "the parts are those of a section")
			require.InEpsilon(t, g.Gross.In(units.SquareMetre), gross.Area.In(units.SquareMetre), 1e-12)
		})
	}
}

// A tee cut off at its overhangs is a tee of those overhangs, cut at its web a
// rectangle, and cut beyond its ends whole: elementary geometry. So is a section
// with slabs at two levels, and one with haunches.
func TestClippedOutlines(t *testing.T) {
	tests := []struct {
		name            string
		points          []beam.Point
		left, right     float64
		area, perimeter float64
		thick           [2]float64
	}{
		{"tee, whole", outline(0, 600, 1100, 600, 1100, 480, 700, 480, 700, 0, 400, 0, 400, 480, 0, 480), 400, 400, 276000, 3400, [2]float64{120, 120}},
		{"tee, wider than it is", outline(0, 600, 1100, 600, 1100, 480, 700, 480, 700, 0, 400, 0, 400, 480, 0, 480), 900, 900, 276000, 3400, [2]float64{120, 120}},
		{"tee, cut", outline(0, 600, 1100, 600, 1100, 480, 700, 480, 700, 0, 400, 0, 400, 480, 0, 480), 100, 250, 180000 + 350*120, 2 * (650 + 600), [2]float64{120, 120}},
		{"tee, its web alone", outline(0, 600, 1100, 600, 1100, 480, 700, 480, 700, 0, 400, 0, 400, 480, 0, 480), 0, 0, 180000, 1800, [2]float64{120, 120}},
		{"slabs at two levels", outline(0, 0, 900, 0, 900, 100, 500, 100, 500, 500, 700, 500, 700, 600, 0, 600), 0, 300, 500*600 + 300*100 + 200*100, 2*(800+600) + 2*200, [2]float64{0, 200}},
		{"haunches", outline(0, 400, 900, 400, 600, 300, 600, 0, 300, 0, 300, 300), 150, 300, 300*400 + 150*(100+50)/2 + 300*100/2, 1000 + 0 + 300 + 300 + 300 + (750 - 1000) + 50 + math.Hypot(150, 50) + math.Hypot(300, 100), [2]float64{100, 100}},
	}
	for _, tt := range tests {
		t.Run(tt.name, func(t *testing.T) {
			g, s := measured(t, beam.Section{Shape: beam.Polygon, Outline: tt.points})
			area, perimeter := s.Clipped(&g, mm(tt.left), mm(tt.right))
			require.InEpsilon(t, tt.area, area.In(units.SquareMillimetre), 1e-9)
			require.InEpsilon(t, tt.perimeter, perimeter.In(units.Millimetre), 1e-9)
			require.Zero(t, testing.AllocsPerRun(10, func() { s.Clipped(&g, mm(tt.left), mm(tt.right)) }))
			slices.Reverse(s.Outline)
			area, perimeter = s.Clipped(&g, mm(tt.left), mm(tt.right))
			require.InEpsilon(t, tt.area, area.In(units.SquareMillimetre), 1e-9, "clockwise")
			require.InEpsilon(t, tt.perimeter, perimeter.In(units.Millimetre), 1e-9, "clockwise")
			for i, thick := range tt.thick {
				require.InDelta(t, thick, g.OverhangThickness[i].In(units.Millimetre), 0.01)
			}
		})
	}
}

func TestGeometryRefusesWhatIsNoSection(t *testing.T) {
	square := outline(0, 0, 400, 0, 400, 400, 0, 400)
	tests := []struct {
		name    string
		section beam.Section
		path    string
	}{
		{"two corners", beam.Section{Outline: outline(0, 0, 400, 400)}, "/section/outline"},
		{"a line that crosses itself", beam.Section{Outline: outline(0, 0, 400, 400, 400, 0, 0, 400)}, "/section/outline"},
		{"no area", beam.Section{Outline: outline(0, 0, 400, 0, 800, 0)}, "/section/outline"},
		{"not a number", beam.Section{Outline: append(outline(0, 0, 400, 0), beam.Point{X: mm(math.NaN()), Y: mm(1)})}, "/section/outline/2"},
		{"beyond any beam", beam.Section{Outline: outline(0, 0, 4e6, 0, 4e6, 4e6)}, "/section/outline/1"},
		{"a point at the top", beam.Section{Outline: outline(0, 0, 400, 0, 200, 400)}, "/section/outline"},
		{"two legs", beam.Section{Outline: outline(0, 0, 100, 0, 100, 300, 300, 300, 300, 0, 400, 0, 400, 400, 0, 400)}, "/section/outline"},
		{"a slant without a strip through it", beam.Section{Outline: outline(0, 0, 100, 0, 500, 400, 400, 400)}, "/section/outline"},
		{"a void outside", beam.Section{Outline: square, Voids: [][]beam.Point{outline(500, 100, 600, 100, 600, 200)}}, "/section/voids/0"},
		{"a void across the side", beam.Section{Outline: square, Voids: [][]beam.Point{outline(300, 100, 600, 100, 600, 200)}}, "/section/voids/0"},
		{"a void in a void", beam.Section{Outline: square, Voids: [][]beam.Point{outline(50, 50, 350, 50, 350, 350, 50, 350), outline(100, 100, 200, 100, 200, 200)}}, "/section/voids/1"},
		{"a void that crosses itself", beam.Section{Outline: square, Voids: [][]beam.Point{outline(100, 100, 200, 200, 200, 100, 100, 200)}}, "/section/voids/0"},
		{"a void of two corners", beam.Section{Outline: square, Voids: [][]beam.Point{outline(100, 100, 200, 200)}}, "/section/voids/0"},
		{"walls of nothing", beam.Section{Outline: square, Voids: [][]beam.Point{outline(2, 100, 398, 100, 398, 200, 2, 200)}}, "/section/outline"},
	}
	for _, tt := range tests {
		t.Run(tt.name, func(t *testing.T) {
			tt.section.Shape = beam.Polygon
			_, faults := beam.GeometryOf(&tt.section)
			require.NotEmpty(t, faults)
			require.Equal(t, tt.path, faults[0].Path)
			require.NotEmpty(t, faults[0].Detail)
			require.NotEmpty(t, faults[0].Allowed)
		})
	}
}

// A polygon measures the same turned round, moved, and begun at another corner.
func TestGeometryDoesNotDependOnHowAnOutlineIsDrawn(t *testing.T) {
	base := outline(50, 0, 350, 0, 400, 500, 700, 500, 700, 620, -300, 620, -300, 500, 0, 500)
	want, _ := measured(t, beam.Section{Shape: beam.Polygon, Outline: base})
	for shift := range base {
		for _, back := range [2]bool{false, true} {
			var points []beam.Point
			for i := range base {
				k := (shift + i) % len(base)
				if back {
					k = (shift - i + len(base)) % len(base)
				}
				points = append(points, beam.Point{X: base[k].X.Add(mm(1234)), Y: base[k].Y.Sub(mm(77))})
			}
			got, _ := measured(t, beam.Section{Shape: beam.Polygon, Outline: points})
			w, g := inMillimetres(&want), inMillimetres(&got)
			for what := range w {
				require.InDelta(t, w[what], g[what], 1e-6, what)
			}
			require.Len(t, got.Parts, len(want.Parts))
		}
	}
}
