package beam

import (
	"slices"

	"soffit.example/bars"
	"soffit.example/units"
)

// enclose sets the stirrup that the bars of a trial lie in, and with it the
// cover: the brief's own, or the least by which the code accepts the stirrup
// and the bars, of which a single one may ask for more than a wider bundle.
func (t *Trial) enclose(stirrup bars.Size, sizes ...bars.Size) {
	t.Stirrup = stirrup
	t.Cover = t.Brief.Cover
	if t.Cover.IsZero() {
		for i := range sizes {
			t.Cover = t.Cover.Max(t.Code.Cover(t.Problem, stirrup, sizes[i]))
		}
	}
}

// cage is the stirrup as the bars see it.
func (t *Trial) cage() bars.Cage {
	c := bars.Cage{
		Width: t.Brief.Section.Width, Depth: t.Brief.Section.Depth,
		SideCover: t.Cover, FaceCover: t.Cover, Stirrup: t.Stirrup,
	}
	if t.Brief.Readings.TuckedCorner {
		c.Corner = bars.Tucked
	}
	return c
}

// flangeRow is a group of like bars in the flange at a face.
type flangeRow struct {
	size    *bars.Size
	count   int
	spacing units.Length
}

// lay puts layers of bars at a face, and rows of bars in its flange, and reads
// everything else off their coordinates.
func (t *Trial) lay(face Face, layers []bars.Layer, flange []flangeRow, inCompression bool) error {
	f := t.Steel(face)
	*f = FaceSteel{Face: face, Rows: f.Rows[:0], Fit: f.Fit, Flange: f.Flange[:0]}
	if len(layers) == 0 {
		f.Fit = bars.Fit{Bars: f.Fit.Bars[:0], Layers: f.Fit.Layers[:0]}
		return nil
	}
	cage := t.cage()
	if err := f.Fit.Lay(&cage, layers, t.Code.Gaps(t.Problem)); err != nil {
		return err
	}
	f.InCompression = inCompression
	f.Area, f.Centroid, f.Count = f.Fit.Area, f.Fit.Centroid, len(f.Fit.Bars)
	f.Nearest, f.Farthest = f.Fit.Bars[0].Y, f.Fit.Bars[0].Y
	f.Largest, f.Smallest = f.Fit.Bars[0].Size, f.Fit.Bars[0].Size
	for i := range f.Fit.Bars {
		b := &f.Fit.Bars[i]
		f.Nearest = f.Nearest.Min(b.Y)
		if f.Fit.Layers[b.Layer-1].Count > 1 {
			f.Farthest = f.Farthest.Max(b.Y)
		}
		if f.Largest.Diameter.Less(b.Size.Diameter) {
			f.Largest = b.Size
		}
		if b.Size.Diameter.Less(f.Smallest.Diameter) {
			f.Smallest = b.Size
		}
		t.count(f, b)
	}
	t.layFlange(f, flange)
	return nil
}

// count adds a bar to the row of its size, layer and height.
func (t *Trial) count(f *FaceSteel, b *bars.Placed) {
	for i := len(f.Rows) - 1; i >= 0 && f.Rows[i].Layer == b.Layer; i-- {
		if r := &f.Rows[i]; r.Size == b.Size && r.Height == b.Y {
			r.Count++
			r.Area = bars.TotalArea(bars.Group{Size: r.Size, Count: r.Count})
			return
		}
	}
	f.Rows = append(f.Rows, RowSteel{
		Size: b.Size, Count: 1, Layer: b.Layer, Height: b.Y, Area: b.Size.Area, Yield: t.yieldOf(f.Face, b.Layer, b.Size.Name),
	})
}

// layFlange adds rows of bars in the flange beside the web, at the level of the
// first layer.
func (t *Trial) layFlange(f *FaceSteel, rows []flangeRow) {
	if len(rows) == 0 {
		return
	}
	first := &f.Fit.Layers[0]
	left, right := f.Fit.Bars[first.First].X, f.Fit.Bars[first.First+first.Count-1].X
	overLeft, overRight := t.Brief.Section.Overhangs(f.Face)
	moment := f.Area.In(units.SquareMetre) * f.Centroid.In(units.Metre)
	for i := range rows {
		r := &rows[i]
		y := t.Cover.Add(t.Stirrup.Diameter).Add(r.size.Diameter.Scale(0.5))
		onLeft := (r.count + 1) / 2
		switch {
		case overLeft.IsZero():
			onLeft = 0
		case overRight.IsZero():
			onLeft = r.count
		}
		for k := range r.count {
			x := &right
			if k < onLeft {
				left, x = left.Sub(r.spacing), &left
			} else {
				right = right.Add(r.spacing)
			}
			f.Flange = append(f.Flange, FlangeBar{Size: *r.size, X: *x, Y: y, Row: i})
		}
		area := bars.TotalArea(bars.Group{Size: *r.size, Count: r.count})
		f.Rows = append(f.Rows, RowSteel{
			Size: *r.size, Count: r.count, Layer: 1, Height: y, Area: area, Yield: t.yieldOf(f.Face, 0, r.size.Name), Flange: true,
		})
		f.Area, f.Count = f.Area.Add(area), f.Count+r.count
		moment += area.In(units.SquareMetre) * y.In(units.Metre)
		f.Nearest = f.Nearest.Min(y)
	}
	f.Centroid = units.Metre.Of(moment / f.Area.In(units.SquareMetre))
	slices.SortFunc(f.Flange, func(a, b FlangeBar) int { return a.X.Compare(b.X) })
}
