package service

import (
	"fmt"

	"soffit.example/beam"
	"soffit.example/service/internal/wire"
)

// layout converts a layout; what is left out is taken from the brief.
func (in *intake) layout(w *wire.Layout, b *beam.Brief, at string) beam.Layout {
	var l beam.Layout
	for i := range w.Longitudinal {
		l.Longitudinal = append(l.Longitudinal, in.row(&w.Longitudinal[i], fmt.Sprintf("%s/longitudinal/%d", at, i)))
	}
	for i := range w.Transverse {
		l.Transverse = append(l.Transverse, in.zone(&w.Transverse[i], b, fmt.Sprintf("%s/transverse/%d", at, i)))
	}
	for i := range w.Bent {
		l.Bent = append(l.Bent, in.bent(&w.Bent[i], fmt.Sprintf("%s/bent/%d", at, i)))
	}
	return l
}

// rowRule is the rule of a row by where it lies, in words too.
func rowRule(face beam.Face, flange bool) (thing string, r rule) {
	switch {
	case face == beam.Side:
		return "a row of side bars", rule{needs: "spacing"}
	case flange:
		return "a row in a flange", rule{needs: "flange spacing", may: "layer yield in_compression"}
	case face != 0:
		return "a row in the web", rule{may: "flange layer bundled yield in_compression"}
	}
	return "", rule{may: "flange layer spacing bundled yield in_compression"} // the face has a fault of its own
}

func (in *intake) row(w *wire.Row, at string) beam.Row {
	r := beam.Row{
		Mark: w.Mark, Bar: w.Bar, Count: w.Count, Face: word[beam.Face](&w.Face), Layer: value(w.Layer),
		Flange: value(w.Flange), Spacing: value(w.Spacing), Bundled: value(w.Bundled), Yield: above(in, at+"/yield", w.Yield),
		InCompression: value(w.InCompression),
		From:          value(w.From), To: value(w.To), Start: "straight", End: "straight",
	}
	if w.Layer == nil && r.Face != beam.Side {
		r.Layer = 1
	}
	thing, belongs := rowRule(r.Face, r.Flange)
	in.belong(at, thing, belongs, []member{
		{"flange", "", w.Flange != nil},
		{"layer", "", w.Layer != nil},
		{"spacing", `a length, e.g. "5 in" or "120 mm"`, w.Spacing != nil},
		{"bundled", "", w.Bundled != nil},
		{"yield", "", w.Yield != nil},
		{"in_compression", "", w.InCompression != nil},
	})
	if w.From != nil && w.To == nil {
		in.fault(at+"/to", aLength, "is missing, and from is given")
	}
	return r
}

func (in *intake) zone(w *wire.Zone, b *beam.Brief, at string) beam.Zone {
	z := beam.Zone{
		Mark: w.Mark, Span: value(w.Span), Bar: w.Bar, Legs: w.Legs, Spacing: w.Spacing,
		Count: value(w.Count), From: value(w.From), To: value(w.To), Form: "closed", Angle: value(w.Angle),
	}
	if w.Form != nil {
		z.Form = *w.Form
	}
	if len(b.Demands) > 0 {
		if w.From != nil || w.To != nil || w.Count != nil || w.Span != nil {
			in.fault(at, "", "has a place along a span, and the brief has demands in place of spans")
		}
		return z
	}
	if w.Span == nil {
		z.Span = 1
	}
	if w.To == nil && z.Span >= 1 && z.Span <= len(b.Spans) {
		z.To = b.Spans[z.Span-1]
	}
	return z
}

func (in *intake) bent(w *wire.Bent, at string) beam.BentBars {
	b := beam.BentBars{
		Mark: w.Mark, Bar: w.Bar, Count: w.Count, Span: value(w.Span), At: w.At, Angle: w.Angle, Rises: w.Rises,
		Bends: value(w.Bends), Spacing: above(in, at+"/spacing", w.Spacing),
	}
	switch several := b.Bends > 1; {
	case several && w.Spacing == nil:
		in.fault(at+"/spacing", `a length, e.g. "8 in" or "200 mm"`, "is missing; bars bent at more than one place need it")
	case !several && w.Spacing != nil:
		in.fault(at+"/spacing", "", "belongs to bars bent at more than one place")
	}
	return b
}

func (o *outlet) layout(l *beam.Layout) wire.LayoutReply {
	w := wire.LayoutReply{
		Longitudinal: make([]wire.RowReply, len(l.Longitudinal)),
		Transverse:   make([]wire.ZoneReply, len(l.Transverse)),
		Bent:         make([]wire.BentReply, len(l.Bent)),
	}
	for i, r := range l.Longitudinal {
		row := wire.RowReply{
			Mark: r.Mark, Bar: r.Bar, Count: r.Count, Face: r.Face.String(), Layer: r.Layer,
			Flange: r.Flange, Spacing: optional(o, r.Spacing), Bundled: r.Bundled, Yield: optional(o, r.Yield), InCompression: r.InCompression, Start: r.Start, End: r.End,
		}
		if !r.To.IsZero() {
			row.From, row.To = o.place(r.From), o.place(r.To)
		}
		w.Longitudinal[i] = row
	}
	for i, z := range l.Transverse {
		zone := wire.ZoneReply{Mark: z.Mark, Span: z.Span, Bar: z.Bar, Legs: z.Legs, Spacing: express(o, z.Spacing), Count: z.Count, Form: z.Form, Angle: z.Angle}
		if !z.To.IsZero() {
			zone.From, zone.To = o.place(z.From), o.place(z.To)
		}
		w.Transverse[i] = zone
	}
	for i, b := range l.Bent {
		w.Bent[i] = wire.BentReply{
			Mark: b.Mark, Bar: b.Bar, Count: b.Count, Span: b.Span, At: *o.place(b.At), Angle: b.Angle, Rises: b.Rises,
			Bends: b.Bends, Spacing: optional(o, b.Spacing),
		}
	}
	return w
}
