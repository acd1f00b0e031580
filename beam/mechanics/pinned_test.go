package mechanics_test

import (
	"bufio"
	"errors"
	"flag"
	"fmt"
	"math"
	"os"
	"path/filepath"
	"strconv"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

var update = flag.Bool("update", false, "rewrite the figures on record")

// pinned are sections of every kind, under laws of every kind. All are invented.
func pinned(t testing.TB) []pin {
	law := func(l mechanics.Law, err error) mechanics.Law {
		t.Helper()
		require.NoError(t, err)
		return l
	}
	point := func(strain, stress float64) mechanics.Point {
		return mechanics.Point{Strain: strain, Stress: mpa(stress)}
	}
	block := whitney(t, mpa(30), 0.85)
	low := whitney(t, mpa(60), 0.65)
	parabola := law(mechanics.ParabolaRectangle(mpa(17), 0.002, 0.0035, 2))
	bilinear := law(mechanics.Bilinear(mpa(20), 0.00175, 0.0035))
	whole := law(mechanics.ParabolaRectangle(mpa(21), 0.003, 0.003, 2))
	softening := law(mechanics.Polyline(point(0, 0), point(0.001, 30), point(0.004, 3)))
	late := law(mechanics.Polyline(point(0.0005, 12), point(0.001, 30), point(0.002, 28), point(0.003, 15), point(0.004, 10)))
	fitted := law(mechanics.ParabolaRectangle(mpa(45), 0.0023, 0.0029, 1.6))

	rectangle := mechanics.Rectangle(mm(300), mm(600))
	tee := mechanics.Tee(mm(900), mm(120), mm(300), mm(700))
	haunched := mechanics.Tee(mm(900), mm(120), mm(350), mm(700))
	haunched[1].BottomWidth = mm(220)
	polygon := []mechanics.Part{
		{Bottom: mm(150), Width: mm(800), BottomWidth: mm(650)},
		{Top: mm(150), Bottom: mm(400), Width: mm(650), BottomWidth: mm(200)},
		{Top: mm(400), Bottom: mm(750), Width: mm(200), BottomWidth: mm(400)},
	}
	split := []mechanics.Part{
		{Bottom: mm(100), Width: mm(500), BottomWidth: mm(450)},
		{Top: mm(100), Bottom: mm(400), Width: mm(450), BottomWidth: mm(300)},
		{Top: mm(400), Bottom: mm(500), Width: mm(300)},
		{Top: mm(500), Bottom: mm(600), Width: mm(300)},
	}
	both := []mechanics.Layer{layerSI(640, 3000, 420), layerSI(60, 1000, 420)}
	mixed := []mechanics.Layer{
		layerSI(90, 700, 280), layerSI(640, 1200, 420), layerSI(380, 300, 550),
		layerSI(580, 900, 690), layerSI(45, 400, 420), layerSI(230, 300, 500),
	}
	var many []mechanics.Layer
	for i := range 40 {
		many = append(many, layerSI(float64(20+(i*17)%40*14), 30+float64(i), 300+10*float64(i)))
	}
	faces := []mechanics.Layer{layerSI(0, 800, 420), layerSI(600, 900, 420), layerSI(0, 100, 1000), layerSI(600, 150, 1000)}
	strong := []mechanics.Layer{layerSI(550, 1500, 1100), layerSI(50, 700, 900)}
	close3 := []mechanics.Layer{layerSI(540, 224e3/420, 420), layerSI(40, 300, 420), layerSI(40.4, 300, 420), layerSI(40.8, 300, 420)}
	kn := units.Kilonewton.Of
	return []pin{
		{"rectangle", rectangle, []mechanics.Layer{layerSI(540, 2000, 420)}, block, units.Force{}},
		{"compression steel yields", rectangle, []mechanics.Layer{layerSI(540, 5000, 420), layerSI(40, 1500, 280)}, block, units.Force{}},
		{"tension steel does not yield", rectangle, []mechanics.Layer{layerSI(540, 9000, 550)}, block, units.Force{}},
		{"two equilibria", rectangle, []mechanics.Layer{layerSI(540, 1476, 420), layerSI(60, 2000, 420)}, block, units.Force{}},
		{"four equilibria", mechanics.Rectangle(mm(150), mm(600)), close3, block, units.Force{}},
		{"steel in the faces", rectangle, faces, block, units.Force{}},
		{"steel stronger than the concrete's strain", rectangle, strong, low, kn(300)},
		{"steel of great strength under a parabola", rectangle, strong, parabola, kn(100)},
		{"shallow block in a tee", tee, both, block, units.Force{}},
		{"deep block in a tee", tee, []mechanics.Layer{layerSI(640, 7000, 420), layerSI(60, 500, 420)}, low, units.Force{}},
		{"inverted tee", mechanics.InvertedTee(mm(900), mm(120), mm(300), mm(700)), both, parabola, units.Force{}},
		{"box", mechanics.Box(mm(900), mm(700), mm(120), mm(150), mm(260)), mixed, block, kn(2500)},
		{"trapezoid", mechanics.Trapezoid(mm(300), mm(500), mm(700)), both, block, units.Force{}},
		{"trapezoid under a parabola", mechanics.Trapezoid(mm(500), mm(250), mm(700)), mixed, parabola, kn(400)},
		{"trapezoid that widens by its depth", mechanics.Trapezoid(mm(500), mm(1500), mm(1000)), both, block, kn(100)},
		{"haunched tee", haunched, mixed, bilinear, units.Force{}},
		{"polygon", polygon, mixed, late, units.Force{}},
		{"polygon in pull", polygon, mixed, block, kn(-600)},
		{"parts that go on", split, strong, whole, kn(200)},
		{"forty layers", rectangle, many, parabola, units.Force{}},
		{"forty layers under a block", rectangle, many, block, kn(500)},
		{"softening", mechanics.Tee(mm(1500), mm(150), mm(100), mm(700)), []mechanics.Layer{layerSI(640, 200, 500)}, softening, kn(1500)},
		{"softening trapezoid", mechanics.Trapezoid(mm(900), mm(150), mm(700)), both, softening, kn(2500)},
		{"late stress", rectangle, []mechanics.Layer{layerSI(540, 3000, 500), layerSI(100, 2000, 500)}, late, kn(300)},
		{"pull", rectangle, []mechanics.Layer{layerSI(540, 2000, 420), layerSI(60, 1000, 420)}, parabola, kn(-700)},
		{"push over the whole depth", tee, both, parabola, kn(5500)},
		{"push on a block over the whole depth", tee, both, low, kn(13500)},
		{"push on a trapezoid over the whole depth", mechanics.Trapezoid(mm(500), mm(250), mm(700)), both, bilinear, kn(5000)},
		{"push on a plain section", polygon, nil, block, kn(3000)},
		{"fitted law", haunched, both, fitted, kn(500)},
		{"fitted law over a rectangle", rectangle, []mechanics.Layer{layerSI(540, 2500, 420), layerSI(60, 1000, 420)}, fitted, units.Force{}},
	}
}

type pin struct {
	name   string
	parts  []mechanics.Part
	layers []mechanics.Layer
	law    mechanics.Law
	axial  units.Force
}

func (p *pin) section() mechanics.Section {
	return mechanics.Section{Parts: p.parts, Layers: p.layers}
}

// record holds figures by what they are of, to be compared with those on file.
type record struct {
	file  string
	lines []string
	known map[string][]float64
}

func newRecord(t *testing.T) *record {
	r := &record{file: filepath.Join("testdata", t.Name()+".txt"), known: map[string][]float64{}}
	if *update {
		t.Cleanup(func() {
			require.NoError(t, os.MkdirAll("testdata", 0o755))
			require.NoError(t, os.WriteFile(r.file, []byte(strings.Join(r.lines, "\n")+"\n"), 0o644))
		})
		return r
	}
	f, err := os.Open(r.file)
	require.NoError(t, err)
	defer f.Close()
	lines := bufio.NewScanner(f)
	lines.Buffer(nil, 1<<20)
	for lines.Scan() {
		name, rest, _ := strings.Cut(lines.Text(), ": ")
		r.known[name] = []float64{}
		for _, field := range strings.Fields(rest) {
			v, err := strconv.ParseFloat(field, 64)
			require.NoError(t, err)
			r.known[name] = append(r.known[name], v)
		}
	}
	require.NoError(t, lines.Err())
	return r
}

// hold compares figures with those on record to the eleventh digit. A figure below
// noise is as good as zero.
func (r *record) hold(t testing.TB, name string, noise float64, figures ...float64) {
	t.Helper()
	if *update {
		line := name + ":"
		for _, v := range figures {
			if math.Abs(v) <= noise {
				v = 0
			}
			line += " " + strconv.FormatFloat(v, 'g', 13, 64)
		}
		r.lines = append(r.lines, line)
		return
	}
	want, ok := r.known[name]
	if !ok || len(want) != len(figures) {
		t.Fatalf("%s: %d figures, %d on record", name, len(figures), len(want))
	}
	for i, v := range figures {
		if !(math.Abs(v-want[i]) <= max(noise, 1e-11*math.Abs(want[i]))) {
			t.Fatalf("%s: figure %d is %.13g, on record %.13g", name, i, v, want[i])
		}
	}
}

// figures lays out all fields of u in SI units but for the residual.
func figures(u *mechanics.Ultimate) []float64 {
	f := []float64{
		float64(u.Equilibria), u.NeutralAxis.In(units.Metre), u.CompressionDepth.In(units.Metre), u.Curvature.In(units.PerMetre),
		u.Concrete.In(units.Newton), u.ConcreteDepth.In(units.Metre), u.ExtremeDepth.In(units.Metre), u.ExtremeStrain,
		u.TensionArea.In(units.SquareMetre), u.EffectiveDepth.In(units.Metre),
		u.TensionSideArea.In(units.SquareMetre), u.TensionSideDepth.In(units.Metre), u.Nominal.In(units.NewtonMetre),
	}
	for _, c := range u.Others {
		f = append(f, c.In(units.Metre))
	}
	for _, l := range u.Layers {
		f = append(f, l.Depth.In(units.Metre), l.Strain, l.Stress.In(units.Pascal), l.Displaced.In(units.Pascal), l.Force.In(units.Newton))
	}
	return f
}

// The whole state of each section, in both senses and by both rules for displaced
// concrete, is that on record; [TestPinnedByFibres] finds the same equilibria.
func TestPinnedUltimate(t *testing.T) {
	r := newRecord(t)
	var solver mechanics.Solver
	var u mechanics.Ultimate
	for _, p := range pinned(t) {
		s := p.section()
		for _, b := range bendings(p.axial) {
			name := fmt.Sprintf("%s, %v, %d", p.name, b.Sense, b.Displaced)
			if err := solver.Ultimate(&u, s, p.law, b); err != nil {
				var none *mechanics.NoEquilibriumError
				require.ErrorAs(t, err, &none)
				r.hold(t, name, 1e-6, none.Least.In(units.Newton), none.Most.In(units.Newton))
				continue
			}
			size := u.Concrete.Abs().Add(p.axial.Abs())
			require.LessOrEqual(t, u.Residual.Abs().Ratio(size), 1e-11, name)
			r.hold(t, name, 1e-9, figures(&u)...)
		}
	}
}

func TestPinnedByFibres(t *testing.T) {
	r := newRecord(t)
	for _, p := range pinned(t) {
		s := p.section()
		for _, b := range bendings(p.axial) {
			if len(p.law.Kinks()) > 8 && b != (mechanics.Bending{}) && testing.Short() {
				continue // a law of scores of pieces takes the fibres long
			}
			name := fmt.Sprintf("%s, %v, %d", p.name, b.Sense, b.Displaced)
			f, err := s.Fibres(p.law, b)
			if err != nil {
				var none *mechanics.NoEquilibriumError
				require.ErrorAs(t, err, &none)
				r.hold(t, name, 1e-6, none.Least.In(units.Newton), none.Most.In(units.Newton))
				require.ErrorAs(t, discard(s.Ultimate(p.law, b)), &none)
				continue
			}
			u := solve(t, s, p.law, b)
			require.LessOrEqual(t, compareRoutes(&u, &f, s.Depth()), 1e-9, name)
			require.LessOrEqual(t, f.Residual.Abs().Ratio(u.Concrete.Abs().Add(p.axial.Abs())), 1e-11, name)
			found := []float64{f.NeutralAxis.In(units.Metre), f.Concrete.In(units.Newton), f.Nominal.In(units.NewtonMetre), float64(f.Equilibria), float64(f.Fibres)}
			for _, c := range f.Others {
				found = append(found, c.In(units.Metre))
			}
			r.hold(t, name, 1e-6, found...)
		}
	}
}

func bendings(axial units.Force) []mechanics.Bending {
	return []mechanics.Bending{
		{Axial: axial},
		{Axial: axial, Sense: mechanics.Hogging},
		{Axial: axial, Displaced: mechanics.Ignore},
		{Axial: axial, Sense: mechanics.Hogging, Displaced: mechanics.Ignore},
	}
}

// Elastic states: a cracked section is in equilibrium, which the test works out
// from strips, and an uncracked one is the sum of strips.
func TestPinnedElastic(t *testing.T) {
	r := newRecord(t)
	const n = 7.5
	for _, p := range pinned(t) {
		s := p.section()
		u, err := s.Uncracked(n)
		require.NoError(t, err)
		area, first, second := strips(s, 0, s.Depth().In(units.Metre))
		for _, l := range s.Layers {
			y, a := l.Depth.In(units.Metre), l.Area.In(units.SquareMetre)*(n-1)
			area, first, second = area+a, first+a*y, second+a*y*y
		}
		require.InEpsilon(t, area, u.Area.In(units.SquareMetre), exact, p.name)
		require.InEpsilon(t, first/area, u.Centroid.In(units.Metre), exact, p.name)
		require.InEpsilon(t, second-first*first/area, u.SecondMoment.In(units.Metre4), 1e-11, p.name)
		require.InEpsilon(t, first/area, u.ToTop.In(units.Metre), exact, p.name)
		require.InEpsilon(t, s.Depth().In(units.Metre)-first/area, u.ToBottom.In(units.Metre), exact, p.name)
		if len(s.Layers) == 0 {
			continue
		}
		for _, sense := range []mechanics.Sense{mechanics.Sagging, mechanics.Hogging} {
			c, err := s.Cracked(n, sense)
			require.NoError(t, err)
			depth, x := s.Depth().In(units.Metre), c.NeutralAxis.In(units.Metre)
			level := x // of the neutral axis, from the top
			area, first, second := 0.0, 0.0, 0.0
			if sense == mechanics.Hogging {
				level = depth - x
				area, first, second = strips(s, level, depth)
			} else {
				area, first, second = strips(s, 0, level)
			}
			scale := 0.0
			for _, l := range s.Layers {
				y, a := l.Depth.In(units.Metre), l.Area.In(units.SquareMetre)*n
				if (y < level) == (sense == mechanics.Sagging) {
					a = l.Area.In(units.SquareMetre) * (n - 1)
				}
				area, first, second = area+a, first+a*y, second+a*y*y
				scale += a * depth
			}
			require.InDelta(t, 0, first-area*level, 1e-12*(scale+math.Abs(first)), "%s %v", p.name, sense)
			require.InEpsilon(t, second-2*level*first+level*level*area, c.SecondMoment.In(units.Metre4), 1e-11, "%s %v", p.name, sense)
			moment := units.KilonewtonMetre.Of(100)
			steel := c.SteelStress(moment, s.Layers[0].Depth)
			r.hold(t, fmt.Sprintf("%s, %v", p.name, sense), 1e-4, x, c.SecondMoment.In(units.Millimetre4),
				c.ConcreteStress(moment).In(units.Pascal), steel.In(units.Pascal), c.ModularRatio)
		}
	}
}

// strips returns the area and its first and second moments about the top face, in
// m, of the concrete between two levels: exact, by Gauss's two points.
func strips(s mechanics.Section, from, to float64) (area, first, second float64) {
	for _, p := range s.Parts {
		top, bottom := p.Top.In(units.Metre), p.Bottom.In(units.Metre)
		above, below := p.Width.In(units.Metre), p.BottomWidth.In(units.Metre)
		if below == 0 {
			below = above
		}
		a, b := max(top, from), min(bottom, to)
		if a >= b {
			continue
		}
		for _, side := range []float64{-1, 1} {
			y := (a+b)/2 + side*(b-a)/2/math.Sqrt(3)
			w := (above + (below-above)*(y-top)/(bottom-top)) * (b - a) / 2
			area, first, second = area+w, first+w*y, second+w*y*y
		}
	}
	return area, first, second
}

// Points along the moment-curvature lines are those on record. At each strain the
// fibres of the truncated law find the same.
func TestPinnedCurves(t *testing.T) {
	r := newRecord(t)
	var solver mechanics.Solver
	for _, p := range pinned(t) {
		if len(p.law.Kinks()) > 8 {
			continue
		}
		s := p.section()
		for _, b := range bendings(p.axial)[:2] {
			ultimate := p.law.Ultimate()
			for _, share := range []float64{0.45, 0.8, 1} {
				name := fmt.Sprintf("%s, %v, %v", p.name, b.Sense, share)
				points, err := solver.MomentCurvature(nil, s, p.law, b, []float64{share * ultimate}, 0)
				if err != nil {
					var none *mechanics.NoEquilibriumError
					require.ErrorAs(t, err, &none, name)
					r.hold(t, name, 1e-6, none.Least.In(units.Newton), none.Most.In(units.Newton))
					continue
				}
				require.Len(t, points, 1)
				c := points[0]
				r.hold(t, name, 1e-9, c.Strain, c.NeutralAxis.In(units.Metre), c.Curvature.In(units.PerMetre), c.Moment.In(units.NewtonMetre),
					c.ExtremeStrain, float64(c.Equilibria))
				cut, err := p.law.Truncated(share * ultimate)
				require.NoError(t, err)
				f, err := s.Fibres(cut, b)
				require.NoError(t, err)
				require.InEpsilon(t, f.NeutralAxis.In(units.Metre), c.NeutralAxis.In(units.Metre), 1e-9, name)
				require.Equal(t, f.Equilibria, c.Equilibria, name)
			}
		}
	}
}

// Required areas are those on record; put back they give the moment.
func TestPinnedRequired(t *testing.T) {
	r := newRecord(t)
	var solver mechanics.Solver
	for _, p := range pinned(t) {
		gross, err := mechanics.Section{Parts: p.parts}.Gross()
		require.NoError(t, err)
		depth := mechanics.Section{Parts: p.parts}.Depth()
		mean, _ := p.law.Resultant()
		for _, b := range bendings(p.axial.Scale(0.1)) {
			tension := mechanics.Layer{Depth: depth.Scale(0.92), Steel: layerSI(0, 0, 420).Steel}
			compression := mechanics.Layer{Depth: depth.Scale(0.07), Steel: layerSI(0, 0, 300).Steel}
			if b.Sense == mechanics.Hogging {
				tension.Depth, compression.Depth = depth.Sub(tension.Depth), depth.Sub(compression.Depth)
			}
			for _, share := range []float64{0.05, 0.2, 0.3, 0.5} {
				name := fmt.Sprintf("%s, %v, %d, %v", p.name, b.Sense, b.Displaced, share)
				moment := mean.MulArea(gross.Area).MulLength(depth).Scale(share)
				one := areaOrGreatest(solver.RequiredTension(p.parts, p.law, b, tension, moment))
				if one > 1 {
					layer := tension
					layer.Area = mm2(one)
					u := solve(t, mechanics.Section{Parts: p.parts, Layers: []mechanics.Layer{layer}}, p.law, b)
					require.InEpsilon(t, moment.In(units.NewtonMetre), u.Nominal.In(units.NewtonMetre), 1e-9, name)
				}
				both, added, err := solver.RequiredBoth(p.parts, p.law, b, tension, compression, 0.005, moment)
				layer := tension
				layer.Area = mm2(1)
				section := mechanics.Section{Parts: p.parts, Layers: []mechanics.Layer{compression, layer}}
				section.Layers[0].Area = mm2(300)
				found := 0.0
				if len(p.law.Kinks()) <= 8 {
					found = areaOrGreatest(solver.RequiredArea(section, 1, p.law, b, moment))
				}
				r.hold(t, name, 1e-12, one, areaOrGreatest(both, err), added.In(units.SquareMillimetre), found)
			}
		}
	}
}

// areaOrGreatest returns an area in mm2, or less than zero what could be reached
// in N-m.
func areaOrGreatest(area units.Area, err error) float64 {
	var unreachable *mechanics.UnreachableError
	switch {
	case err == nil:
		return area.In(units.SquareMillimetre)
	case errors.As(err, &unreachable):
		return -unreachable.Greatest.In(units.NewtonMetre)
	}
	return math.NaN()
}
