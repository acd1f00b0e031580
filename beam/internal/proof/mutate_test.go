package proof

import (
	"fmt"
	"slices"
	"strings"

	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/units"
)

// mutations are layouts a little worse than the one given, or another way: a
// bar less or more, a size less, a lower grade, bundles, bars no longer relied
// on, bars of a flange moved into the web or left out; stirrups wider, thinner,
// with a leg less, over a shorter length, open, inclined.
func mutations(l beam.Layout, b beam.Brief) []beam.Layout {
	var out []beam.Layout
	copied := func() beam.Layout {
		return beam.Layout{Longitudinal: slices.Clone(l.Longitudinal), Transverse: slices.Clone(l.Transverse)}
	}
	catalog, err := bars.Lookup(b.Reinforcement.Catalog)
	if err != nil {
		return nil
	}
	smaller := func(name string) (string, bool) {
		s, err := catalog.Size(name)
		if err != nil || s.Order == 0 {
			return "", false
		}
		return catalog.At(s.Order - 1).Name, true
	}
	for i, r := range l.Longitudinal {
		if r.Count > 1 {
			m := copied()
			m.Longitudinal[i].Count--
			out = append(out, m)
		}
		if name, ok := smaller(r.Bar); ok {
			m := copied()
			m.Longitudinal[i].Bar = name
			out = append(out, m)
		}
		m := copied()
		m.Longitudinal[i].Count++
		out = append(out, m)
		if r.InCompression {
			m := copied()
			for k := range m.Longitudinal {
				m.Longitudinal[k].InCompression = false
			}
			out = append(out, m)
		}
		if r.Face == beam.Side || r.Flange {
			m := copied()
			m.Longitudinal = slices.Delete(m.Longitudinal, i, i+1)
			out = append(out, m)
			m = copied()
			m.Longitudinal[i].Spacing = r.Spacing.Scale(0.85)
			out = append(out, m)
		}
		if r.Flange {
			m := copied()
			row := &m.Longitudinal[i]
			row.Flange, row.Layer, row.Spacing = false, 1, units.Length{}
			out = append(out, m)
			m = copied()
			m.Longitudinal[i].Spacing = r.Spacing.Scale(1.15)
			out = append(out, m)
		}
		if r.Face != beam.Side {
			m := copied()
			m.Longitudinal[i].Yield = b.Reinforcement.Yield.Scale(0.8)
			out = append(out, m)
		}
		if r.Bundled < 2 && !r.Flange && r.Face != beam.Side && r.Count%2 == 0 && r.Count > 2 && alone(l, i) {
			m := copied()
			m.Longitudinal[i].Bundled = 2
			out = append(out, m)
		}
	}
	if len(b.Spans) > 0 && len(l.Transverse) > 0 {
		z := l.Transverse[0]
		for _, bends := range []int{1, 3} {
			m := copied()
			m.Transverse[0].Spacing, m.Transverse[0].Count = z.Spacing.Scale(1.2), 0
			bent := beam.BentBars{
				Bar: l.Longitudinal[0].Bar, Count: 2, Span: 1, At: z.From.Add(units.Inch.Of(24)), Angle: 45, Rises: "left", Bends: bends,
			}
			if bends > 1 {
				bent.Spacing = units.Inch.Of(10)
			}
			m.Bent = []beam.BentBars{bent}
			out = append(out, m)
		}
	}
	for i, z := range l.Transverse {
		for _, factor := range []float64{1.1, 1.6, 3} {
			m := copied()
			m.Transverse[i].Spacing, m.Transverse[i].Count = z.Spacing.Scale(factor), 0
			out = append(out, m)
		}
		if name, ok := smaller(z.Bar); ok {
			m := copied()
			m.Transverse[i].Bar = name
			out = append(out, m)
		}
		if z.Legs > 2 {
			m := copied()
			m.Transverse[i].Legs--
			out = append(out, m)
		}
		m := copied()
		m.Transverse[i].Form = "open"
		out = append(out, m)
		for _, angle := range []float64{40, 60} {
			m := copied()
			m.Transverse[i].Angle, m.Transverse[i].Spacing, m.Transverse[i].Count = angle, z.Spacing.Scale(1.3), 0
			out = append(out, m)
		}
		if z.From.Less(z.To) {
			m := copied()
			length := z.To.Sub(z.From)
			m.Transverse[i].From, m.Transverse[i].Count = z.From.Add(length.Scale(0.3)), 0
			out = append(out, m)
			m = copied()
			m.Transverse[i].To, m.Transverse[i].Count = z.To.Sub(length.Scale(0.2)), 0
			out = append(out, m)
		}
		m = copied()
		m.Transverse = slices.Delete(m.Transverse, i, i+1)
		out = append(out, m)
	}
	return out
}

// alone reports whether a row has its layer to itself.
func alone(l beam.Layout, i int) bool {
	for k := range l.Longitudinal {
		if a, b := &l.Longitudinal[i], &l.Longitudinal[k]; k != i && a.Face == b.Face && a.Layer == b.Layer && !b.Flange {
			return false
		}
	}
	return true
}

// describe says a layout in one line.
func describe(l beam.Layout) string {
	var b strings.Builder
	for _, r := range l.Longitudinal {
		fmt.Fprintf(&b, "%d %s %s %d", r.Count, r.Bar, r.Face, r.Layer)
		if r.Flange {
			b.WriteString(" flange")
		}
		if !r.Spacing.IsZero() {
			fmt.Fprintf(&b, " at %v", r.Spacing)
		}
		if r.Bundled > 1 {
			fmt.Fprintf(&b, " by %d", r.Bundled)
		}
		if !r.Yield.IsZero() {
			fmt.Fprintf(&b, " of %v", r.Yield)
		}
		if r.InCompression {
			b.WriteString(" relied")
		}
		b.WriteString("; ")
	}
	for _, z := range l.Transverse {
		fmt.Fprintf(&b, "%s %d legs at %v from %v to %v; ", z.Bar, z.Legs, z.Spacing, z.From, z.To)
	}
	for _, r := range l.Bent {
		fmt.Fprintf(&b, "%d bends of %d %s at %v; ", r.Bends, r.Count, r.Bar, r.At)
	}
	return b.String()
}
