package proof

import (
	"fmt"
	"slices"
	"strings"

	"soffit.example/bars"
	"soffit.example/beam"
)

// mutations are layouts a little worse than the one given: a bar less, a size
// less, bars no longer relied on, stirrups wider, thinner, with a leg less,
// over a shorter length, open.
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
		if r.Face == beam.Side {
			m := copied()
			m.Longitudinal = slices.Delete(m.Longitudinal, i, i+1)
			out = append(out, m)
		}
	}
	for i, z := range l.Transverse {
		for _, factor := range []float64{1.1, 1.6, 3} {
			m := copied()
			m.Transverse[i].Spacing = z.Spacing.Scale(factor)
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

// describe says a layout in one line.
func describe(l beam.Layout) string {
	var b strings.Builder
	for _, r := range l.Longitudinal {
		fmt.Fprintf(&b, "%d %s %s %d", r.Count, r.Bar, r.Face, r.Layer)
		if r.InCompression {
			b.WriteString(" relied")
		}
		b.WriteString("; ")
	}
	for _, z := range l.Transverse {
		fmt.Fprintf(&b, "%s %d legs at %v from %v to %v; ", z.Bar, z.Legs, z.Spacing, z.From, z.To)
	}
	return b.String()
}
