package beam

import "soffit.example/bars"

// enclose sets the stirrup that the bars of a trial lie in, and with it the
// cover: the brief's own, or the least by which the code accepts the stirrup
// and the largest bar.
func (t *Trial) enclose(stirrup, largest bars.Size) {
	t.Stirrup = stirrup
	t.Cover = t.Brief.Cover
	if t.Cover.IsZero() {
		t.Cover = t.Code.Cover(t.Problem, stirrup, largest)
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

// lay puts layers of bars at a face and reads everything else off their
// coordinates.
func (t *Trial) lay(face Face, layers []bars.Layer, inCompression bool) error {
	f := t.Steel(face)
	*f = FaceSteel{Face: face, Rows: f.Rows[:0], Fit: f.Fit}
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
		f.count(b)
	}
	return nil
}

// count adds a bar to the row of its size, layer and height.
func (f *FaceSteel) count(b *bars.Placed) {
	for i := len(f.Rows) - 1; i >= 0 && f.Rows[i].Layer == b.Layer; i-- {
		if r := &f.Rows[i]; r.Size == b.Size && r.Height == b.Y {
			r.Count++
			r.Area = bars.TotalArea(bars.Group{Size: r.Size, Count: r.Count})
			return
		}
	}
	f.Rows = append(f.Rows, RowSteel{Size: b.Size, Count: 1, Layer: b.Layer, Height: b.Y, Area: b.Size.Area})
}
