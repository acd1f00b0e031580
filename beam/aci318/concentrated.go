package aci318

import (
	"cmp"
	"math"
	"slices"

	"soffit.example/beam"
	"soffit.example/units"
)

// The standard speaks of concentrated loads and draws no line to distributed
// ones. These are judgements.
const (
	// A distributed load of one case is concentrated if more than this share of
	// it lies within a length of one depth, over which it spreads anyway on its
	// way to mid-depth.
	concentratedShare = 0.5
	// A load below this share of all that the span carries is not looked at.
	negligibleShare = 0.01
	// Between the face of a support and d from it a beam carries no more than
	// this many times its even share of the load, or the shear at d would leave
	// out a load that is concentrated there.
	evenShare = 2.0
)

// patch is a length over which a load acts as a concentrated one.
type patch struct {
	load     int // the first load of it, counted from one
	from, to units.Length
}

// concentratedLoads lists what acts on a span as a concentrated load: point
// loads, and distributed loads as far as they are concentrated. Loads of a case
// that abut are one load, however they were typed.
func concentratedLoads(p *beam.Problem, span int) []patch {
	b := &p.Brief
	length := b.Spans[span-1].In(units.Metre)
	carried := p.SelfWeight.In(units.NewtonPerMetre) * length
	var out []patch
	var strips []strip
	for i := range b.Loads {
		l := &b.Loads[i]
		if l.Span != 0 && l.Span != span {
			continue
		}
		switch l.Shape {
		case beam.Uniform:
			carried += math.Abs(l.Intensity.In(units.NewtonPerMetre)) * length
		case beam.PointLoad:
			carried += math.Abs(l.Force.In(units.Newton))
		case beam.Partial:
			s := newStrip(i+1, l)
			carried += s.total()
			if !l.Hung && s.total() > 0 {
				strips = append(strips, s)
			}
		}
	}
	least := negligibleShare * carried
	for i := range b.Loads {
		l := &b.Loads[i]
		if l.Shape == beam.PointLoad && !l.Hung && (l.Span == 0 || l.Span == span) && math.Abs(l.Force.In(units.Newton)) > least {
			out = append(out, patch{i + 1, l.At, l.At})
		}
	}
	slices.SortStableFunc(strips, func(a, b strip) int { return cmp.Or(cmp.Compare(a.of, b.of), cmp.Compare(a.from, b.from)) })
	for len(strips) > 0 {
		n, to := 1, strips[0].to
		for n < len(strips) && strips[n].of == strips[0].of && strips[n].from <= to+noLength*length {
			to = max(to, strips[n].to)
			n++
		}
		if at, ok := heaviest(strips[:n], to, b.Section.Depth.In(units.Metre), least); ok {
			at.load = strips[0].load
			out = append(out, at)
		}
		strips = strips[n:]
	}
	return out
}

// strip is a distributed load in SI units, by magnitude.
type strip struct {
	load     int
	of       beam.LoadCase
	from, to float64
	w, wEnd  float64
}

func newStrip(load int, l *beam.Load) strip {
	end := l.Intensity
	if l.Varies {
		end = l.IntensityEnd
	}
	return strip{
		load, l.Case, l.From.In(units.Metre), l.To.In(units.Metre),
		math.Abs(l.Intensity.In(units.NewtonPerMetre)), math.Abs(end.In(units.NewtonPerMetre)),
	}
}

func (s *strip) total() float64 { return (s.w + s.wEnd) / 2 * (s.to - s.from) }

// within is the part of a strip between two places.
func (s *strip) within(a, z float64) float64 {
	a, z = max(a, s.from), min(z, s.to)
	if z <= a {
		return 0
	}
	at := func(x float64) float64 { return s.w + (s.wEnd-s.w)*(x-s.from)/(s.to-s.from) }
	return (at(a) + at(z)) / 2 * (z - a)
}

// windows is how many places of the window are tried between the ends of a
// load, beside the ends themselves.
const windows = 64

// heaviest is where a length of one depth holds so much of a load made of strips
// that abut that it is a concentrated one, from the first such length to the
// last; ok is false if there is none.
func heaviest(strips []strip, to, depth, least float64) (at patch, ok bool) {
	from, total := strips[0].from, 0.0
	for i := range strips {
		total += strips[i].total()
	}
	first, last := math.Inf(1), math.Inf(-1)
	try := func(a float64) {
		held := 0.0
		for i := range strips {
			held += strips[i].within(a, a+depth)
		}
		if held > concentratedShare*total {
			first, last = min(first, max(a, from)), max(last, min(a+depth, to))
		}
	}
	for i := 0; i <= windows; i++ {
		try(from + max(to-depth-from, 0)*float64(i)/windows)
	}
	for i := range strips {
		try(strips[i].from)
		try(strips[i].to - depth)
	}
	return patch{from: units.Metre.Of(first), to: units.Metre.Of(last)}, total > least && first < last
}
