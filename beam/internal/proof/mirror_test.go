package proof

import (
	"context"
	"math"
	"slices"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/beam"
	"soffit.example/beam/internal/briefs"
	"soffit.example/units"
)

// turned is a brief of demands upside down: the section, and the moments.
func turned(b beam.Brief) (beam.Brief, bool) {
	s := b.Section
	switch s.Shape {
	case beam.Tee:
		if s.Isolated || s.Joist {
			return b, false
		}
		s.Shape = beam.InvertedTee
	case beam.InvertedTee:
		s.Shape = beam.Tee
	case beam.Ell:
		return b, false
	case beam.Polygon:
		flip := func(points []beam.Point) []beam.Point {
			out := slices.Clone(points)
			for i := range out {
				out[i].Y = out[i].Y.Neg()
			}
			return out
		}
		s.Outline, s.Voids = flip(s.Outline), slices.Clone(s.Voids)
		for i := range s.Voids {
			s.Voids[i] = flip(s.Voids[i])
		}
	}
	b.Section = s
	b.Demands = slices.Clone(b.Demands)
	for i := range b.Demands {
		b.Demands[i].Moment = b.Demands[i].Moment.Neg()
	}
	return b, true
}

// turnedLayout is a layout upside down.
func turnedLayout(l beam.Layout) beam.Layout {
	l.Longitudinal = slices.Clone(l.Longitudinal)
	for i := range l.Longitudinal {
		if r := &l.Longitudinal[i]; r.Face != beam.Side {
			r.Face = r.Face.Opposite()
		}
	}
	return l
}

// turnedID is the id of the check that says of the beam upside down what one
// says of the beam.
func turnedID(id string) string {
	for _, pair := range [][2]string{{".positive", ".negative"}, {".bottom", ".top"}} {
		for k, suffix := range pair {
			if rest, ok := strings.CutSuffix(id, suffix); ok {
				return rest + pair[1-k]
			}
		}
	}
	return id
}

// worstByID is the greatest utilization of each check that was judged, and of
// those of one face by the face.
func worstByID(r *beam.Result, turn bool) map[string]float64 {
	out := map[string]float64{}
	for i := range r.Checks {
		c := &r.Checks[i]
		if !judged(c) {
			continue
		}
		id, face := c.ID, c.Face
		if turn {
			if id = turnedID(id); face == beam.Bottom || face == beam.Top {
				face = face.Opposite()
			}
		}
		if face != 0 {
			id += " at the " + face.String()
		}
		out[id] = math.Max(out[id], c.Utilization)
	}
	return out
}

// TestUpsideDown judges a section and its bars, and the same upside down under
// the opposite moments: the same numbers. Only what belongs to floors is left
// out: a slab exempts the beam below it from least stirrups and limits the
// aggregate, and bars along the sides count from the soffit.
func TestUpsideDown(t *testing.T) {
	compared := map[beam.Shape]int{}
	rapid.Check(t, func(t *rapid.T) {
		s, r := designed(t)
		b, ok := turned(s.Brief)
		if s.Kind != briefs.Sound || len(s.Brief.Demands) == 0 || !ok || len(r.Layout.Longitudinal) == 0 {
			t.Skip("not a section that can be turned")
		}
		b = designedAs(b, r.Section.Depth)
		other, err := beam.CheckLayout(context.Background(), codes[s.Code], b, turnedLayout(r.Layout))
		require.NoError(t, err)
		if !sameSides(r, other) {
			t.Skip("side bars lie elsewhere")
		}
		want, got := worstByID(r, false), worstByID(other, true)
		for id, u := range want {
			if slices.ContainsFunc([]string{"shear.minimum", "shear.spacing", "side-face", "aggregate"}, func(of string) bool { return strings.HasPrefix(id, of) }) {
				continue
			}
			if s.Brief.Section.Flange() != 0 && strings.HasPrefix(id, "cover") {
				continue // ledges have a face of their own below
			}
			g, ok := got[id]
			require.Truef(t, ok, "%s is not judged upside down", id)
			require.InDeltaf(t, u, g, 1e-7*(1+u), "%s", id)
		}
		compared[s.Brief.Section.Shape]++
	})
	t.Logf("compared: %v", compared)
	require.NotEmpty(t, compared)
}

// sameSides reports whether the bars along the sides lie as high above one
// face in one beam as above the other in its image.
func sameSides(a, b *beam.Result) bool {
	heights := func(r *beam.Result) (out []float64) {
		for i := range r.Bars {
			if r.Bars[i].Face == beam.Side {
				out = append(out, r.Bars[i].Y.In(units.Metre))
			}
		}
		slices.Sort(out)
		return out
	}
	x, y := heights(a), heights(b)
	slices.Reverse(y)
	h := a.Section.Depth.In(units.Metre)
	return slices.EqualFunc(x, y, func(p, q float64) bool { return math.Abs(p+q-h) < 1e-9 })
}

// TestMoreSteelHelps adds a bar to a face in tension, or exchanges stirrups for
// thicker ones of the same set: what they are there for is met no worse.
func TestMoreSteelHelps(t *testing.T) {
	added := 0
	rapid.Check(t, func(t *rapid.T) {
		s, r := designed(t)
		if r.Verdict != beam.Satisfied {
			t.Skip("not satisfied")
		}
		b := s.Brief
		b = designedAs(b, r.Section.Depth)
		l := r.Layout
		l.Longitudinal = slices.Clone(l.Longitudinal)
		i := rapid.IntRange(0, len(l.Longitudinal)-1).Draw(t, "row")
		row := &l.Longitudinal[i]
		if row.Flange || row.Face == beam.Side || row.Layer > 1 || row.InCompression || row.Bundled > 1 {
			t.Skip("a row whose bars move others")
		}
		row.Count++
		again, err := beam.CheckLayout(context.Background(), codes[s.Code], b, l)
		require.NoError(t, err)
		want, got := worst(r.Checks), worst(again.Checks)
		sense := ".positive"
		if row.Face == beam.Top {
			sense = ".negative"
		}
		for _, id := range []string{"flexure" + sense, "torsion.longitudinal." + row.Face.String(), "crack.spacing"} {
			u, ok := want[id]
			// Steel beyond that of a tension-controlled section lowers φ.
			if ok && (id == "crack.spacing" || got["flexure.strain"+sense] <= 0.8) && got["flexure.strain"+sense] < 1 && want["flexure.strain"+sense] > 0 {
				require.LessOrEqualf(t, got[id], u*(1+1e-9), "%s with one more %s", id, row.Mark)
				added++
			}
		}
	})
	require.Positive(t, added)
}

// worst is the greatest utilization of each check that was judged.
func worst(checks []beam.Check) map[string]float64 {
	out := map[string]float64{}
	for i := range checks {
		if c := &checks[i]; judged(c) {
			out[c.ID] = math.Max(out[c.ID], c.Utilization)
		}
	}
	return out
}
