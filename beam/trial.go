package beam

import (
	"soffit.example/bars"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// Trial is one complete arrangement put to the code: the problem and its
// bars, lying where they would lie.
type Trial struct {
	*Problem
	Stirrup bars.Size    // zero value: none
	Cover   units.Length // clear, to the stirrups, or to the bars if there are none
	Bottom  FaceSteel
	Top     FaceSteel
	Side    SideSteel // zero: no side-face bars
	Zones   []Zone
	ZoneBar []bars.Size // the stirrup size of each zone, in step with Zones
	Bent    []BentBars
	BentBar []bars.Size // the size of each of Bent

	// Record asks Judge for the working of each check.
	Record bool

	// Focus, if not zero, is the one zone (counted from one) that is in
	// doubt: the search knows that the others pass. A code may judge them
	// all the same.
	Focus int

	// Solver, Law and Ultimate are working space for the code's
	// flexure kernel, so that a search allocates once.
	Solver   mechanics.Solver
	Law      mechanics.Law
	Ultimate mechanics.Ultimate
	layers   []mechanics.Layer
	yields   []rowYield
}

// FaceSteel is the steel of one face, by coordinates.
type FaceSteel struct {
	Face Face
	Rows []RowSteel // by layer, nearest the face first; mixed sizes are rows of one layer
	Fit  bars.Fit   // every bar inside the stirrups by coordinates, with the gaps and spacings they leave
	// Flange are the bars in the flange beside the web, from left to right: X
	// is measured as in Fit, from the left side of the web, and may lie
	// outside it.
	Flange []FlangeBar
	Area   units.Area // catalogue areas, added as decimals
	// Centroid, Nearest and Farthest are distances from this face to the
	// centroid of all bars, to the centre of the nearest, and to the highest
	// layer of more than one bar, whose outer bars stand at the legs.
	Centroid, Nearest, Farthest units.Length
	Largest, Smallest           bars.Size
	Count                       int
	// InCompression says that the bars are relied on as compression steel
	// under the moment that presses on this face.
	InCompression bool
}

// FlangeBar is a bar in the flange beside the web.
type FlangeBar struct {
	Size bars.Size
	X, Y units.Length // Y from the face at which the bars lie
	Row  int          // counted from the web outward, from zero
}

// Beside is on which side of the web a bar of a flange lies, 0 the left and 1
// the right, and how far from it.
func (t *Trial) Beside(b *FlangeBar) (side int, out units.Length) {
	if width := t.Brief.Section.Width; !b.X.Less(width.Scale(0.5)) {
		return 1, b.X.Sub(width)
	}
	return 0, b.X.Neg()
}

// WithinSpread takes off layers, as Layers gives them for tension at a face,
// the bars that lie farther out in the flange than the code spreads tension
// steel. It works in place.
func (t *Trial) WithinSpread(face Face, layers []mechanics.Layer) []mechanics.Layer {
	f := t.Steel(face)
	if len(f.Flange) == 0 {
		return layers
	}
	beyond := t.Code.Spread(t.Problem, face).Sub(t.Brief.Section.Width).Scale(0.5)
	left, right := t.Brief.Section.Overhangs(face)
	ends := [2]units.Length{beyond.Min(left), beyond.Min(right)}
	kept, row := 0, 0 // row of the flange
	for i := range layers {
		l := layers[i]
		if i < len(f.Rows) && f.Rows[i].Flange {
			within, all := t.rowWithin(f, row, ends)
			row++
			if within == 0 {
				continue
			}
			if within < all {
				l.Area = l.Area.Scale(float64(within) / float64(all))
			}
		}
		layers[kept] = l
		kept++
	}
	return layers[:kept]
}

// rowWithin is how many bars of a flange row, counted from the web, lie within
// two distances from the web, and how many there are.
func (t *Trial) rowWithin(f *FaceSteel, row int, ends [2]units.Length) (within, all int) {
	for i := range f.Flange {
		b := &f.Flange[i]
		if b.Row != row {
			continue
		}
		all++
		if side, out := t.Beside(b); out.AtMost(ends[side]) {
			within++
		}
	}
	return within, all
}

// SideSteel is distributed steel along both side faces: Each bars a side at
// Spacing, the first one spacing from the Farthest of TensionFace.
type SideSteel struct {
	Size        bars.Size
	Each        int
	Spacing     units.Length
	Yield       units.Stress
	TensionFace Face
}

// RowSteel is one group of like bars with its depth resolved.
type RowSteel struct {
	Size   bars.Size
	Count  int
	Layer  int
	Height units.Length // of the bars' centres from their face
	Area   units.Area
	Yield  units.Stress
	Flange bool // beside the web
}

// Highest is the distance from the face to the centre of the bar farthest from
// it.
func (f *FaceSteel) Highest() (y units.Length) {
	for i := range f.Rows {
		y = y.Max(f.Rows[i].Height)
	}
	return y
}

// Steel is the steel of a face.
func (t *Trial) Steel(f Face) *FaceSteel {
	if f == Top {
		return &t.Top
	}
	return &t.Bottom
}

// EffectiveDepth is the depth of the centroid of all bars on the tension
// face of a sense of bending, from the opposite face; zero without bars.
func (t *Trial) EffectiveDepth(s Sense) units.Length {
	f := t.Steel(s.TensionFace())
	if f.Count == 0 {
		return units.Length{}
	}
	return t.Brief.Section.Depth.Sub(f.Centroid)
}

// ExtremeDepth is the depth of the bars nearest the tension face.
func (t *Trial) ExtremeDepth(s Sense) units.Length {
	f := t.Steel(s.TensionFace())
	if f.Count == 0 {
		return units.Length{}
	}
	return t.Brief.Section.Depth.Sub(f.Nearest)
}

// Layers gives the trial's longitudinal steel to the flexure kernel, each row
// with its own yield strength: the tension face of sense s, the other face if
// it is relied on in compression, but for the bars in a flange, which no
// stirrup ties, and the side bars where the brief counts them. The slice is
// reused by the next call.
func (t *Trial) Layers(s Sense, modulus units.Stress) []mechanics.Layer {
	t.layers = t.layers[:0]
	for _, face := range [2]Face{s.TensionFace(), s.TensionFace().Opposite()} {
		f := t.Steel(face)
		if face != s.TensionFace() && !f.InCompression {
			continue
		}
		for i := range f.Rows {
			r := &f.Rows[i]
			if r.Flange && face != s.TensionFace() {
				continue
			}
			depth := r.Height
			if face == Bottom {
				depth = t.Brief.Section.Depth.Sub(depth)
			}
			t.layers = append(t.layers, mechanics.Layer{Depth: depth, Area: r.Area, Steel: mechanics.Steel{Modulus: modulus, Yield: r.Yield}})
		}
	}
	if t.Brief.Readings.CountSideBars && !t.Twisted {
		steel := mechanics.Steel{Modulus: modulus, Yield: t.Side.Yield}
		for i := range t.Side.Each {
			t.layers = append(t.layers, mechanics.Layer{Depth: t.sideDepth(i), Area: t.Side.Size.Area.Scale(2), Steel: steel})
		}
	}
	return t.layers
}

// sideDepth is the depth of the i-th pair of side bars, from the top face.
func (t *Trial) sideDepth(i int) units.Length {
	s := &t.Side
	from := t.Steel(s.TensionFace).Farthest.Add(s.Spacing.Scale(float64(i + 1)))
	if s.TensionFace == Top {
		return from
	}
	return t.Brief.Section.Depth.Sub(from)
}

// rowYield is the yield strength of bars that are not of the brief's own.
type rowYield struct {
	face  Face
	layer int
	bar   string
	yield units.Stress
}

// yieldOf is the yield strength of the bars of a size in a layer.
func (t *Trial) yieldOf(face Face, layer int, bar string) units.Stress {
	for i := range t.yields {
		if y := &t.yields[i]; y.face == face && y.layer == layer && y.bar == bar {
			return y.yield
		}
	}
	return t.Brief.Reinforcement.Yield
}
