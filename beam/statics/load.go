package statics

import (
	"fmt"
	"math"

	"soffit.example/units"
)

// MaxLoads is the most loads that one analysis takes.
const MaxLoads = 10_000

// A Load acts on one span of a beam or on each of them. Its size is at most
// 1e12 N/m, N or N-m, in either sense.
type Load struct {
	ID    string // the caller's name for it, free and optional
	Case  string // the case it belongs to, such as "dead"; required
	Span  int    // which span, counted from 1; 0 is every span
	Shape Shape  // how it acts; required
}

// A Shape says how a load acts along a span. It holds a [Uniform], [Partial],
// [Point] or [Couple], by value. Positions run from the left end of the span
// and lie on it, its ends included. What acts at a support, or within 1e-9 of
// the span from it, goes into the reaction there.
type Shape interface{ shape() }

func (Uniform) shape() {}
func (Partial) shape() {}
func (Point) shape()   {}
func (Couple) shape()  {}

// Uniform is a load spread evenly over the whole span.
type Uniform struct {
	Intensity units.LineLoad // positive downward
}

// Partial is a load spread over part of a span, growing or falling linearly
// from Intensity at From to IntensityEnd at To. Equal intensities give an even
// strip, and a zero IntensityEnd a triangle that fades out at To.
type Partial struct {
	From, To                units.Length   // From lies left of To
	Intensity, IntensityEnd units.LineLoad // positive downward
}

// Point is a concentrated force.
type Point struct {
	Force units.Force // positive downward
	At    units.Length
}

// Couple is a concentrated moment.
type Couple struct {
	Moment units.Moment // positive clockwise
	At     units.Length
}

// An action is a load in SI units, its positions on the span: a strip if to is
// right of from, otherwise a force and a couple at from.
type action struct {
	from, to      float64 // m
	force, couple float64 // N, N-m
	w, wEnd       float64 // N/m
}

// actionOf returns what a load of the given shape does on a span of the given
// length in m, and its faults, their fields named from the load on. It reports
// false for a shape that is none of the four.
func actionOf(shape Shape, length float64) (a action, faults []*RangeError, known bool) {
	switch s := shape.(type) {
	case Uniform:
		a.w = s.Intensity.In(units.NewtonPerMetre)
		a.wEnd, a.to = a.w, length
		faults = magnitude(faults, "intensity", units.DimLineLoad, a.w)
	case Partial:
		a.w = s.Intensity.In(units.NewtonPerMetre)
		a.wEnd = s.IntensityEnd.In(units.NewtonPerMetre)
		a.from, faults = place(faults, "from", s.From, length)
		a.to, faults = place(faults, "to", s.To, length)
		if faults == nil && (a.from >= a.to || units.AtMost(a.to, a.from)) {
			e := outside("to", units.DimLength, a.to, a.from, length)
			e.LeastOpen = true
			faults = append(faults, e)
		}
		faults = magnitude(faults, "intensity", units.DimLineLoad, a.w)
		faults = magnitude(faults, "intensity_end", units.DimLineLoad, a.wEnd)
	case Point:
		a.force = s.Force.In(units.Newton)
		a.from, faults = place(faults, "at", s.At, length)
		a.to = a.from
		faults = magnitude(faults, "force", units.DimForce, a.force)
	case Couple:
		a.couple = s.Moment.In(units.NewtonMetre)
		a.from, faults = place(faults, "at", s.At, length)
		a.to = a.from
		faults = magnitude(faults, "moment", units.DimMoment, a.couple)
	default:
		return a, nil, false
	}
	return a, faults, true
}

// place returns where on the span a load acts, in m, and appends a fault if it
// is off the span. A place that misses an end of the span by no more than
// rounding is moved there: a load meant for a support must not stand beside it
// and show in the shear.
func place(faults []*RangeError, field string, at units.Length, length float64) (float64, []*RangeError) {
	x, ok := onSpan(at.In(units.Metre), length)
	switch {
	case !ok:
		faults = append(faults, outside(field, units.DimLength, x, 0, length))
	case units.AtMost(length, length-x):
		x = 0
	case units.AtMost(length, x):
		x = length
	}
	return x, faults
}

// magnitude appends a fault if a load is not finite or beyond any real one.
func magnitude(faults []*RangeError, field string, dim units.Dimension, v float64) []*RangeError {
	if math.Abs(v) <= maxMagnitude {
		return faults
	}
	return append(faults, outside(field, dim, v, -maxMagnitude, maxMagnitude))
}

// onSpan reports whether x lies on a span, and returns it moved to the end of
// the span if rounding had put it just beyond.
func onSpan(x, length float64) (float64, bool) {
	if length <= 0 || !(units.AtMost(x, length) && units.AtMost(length-x, length)) {
		return x, false
	}
	return min(max(x, 0), length), true
}

// slope is the change of a strip's intensity per metre.
func (a *action) slope() float64 { return (a.wEnd - a.w) / (a.to - a.from) }

// isStrip reports whether the load is spread over a length.
func (a *action) isStrip() bool { return a.to > a.from }

// total is the sum of the load's forces, up and down alike counted positive,
// and of its couple over the span.
func (a *action) total(length float64) float64 {
	spread := max(math.Abs(a.w), math.Abs(a.wEnd)) * (a.to - a.from)
	return math.Abs(a.force) + math.Abs(a.couple)/length + spread
}

// checkLoads returns the actions of the loads, in their order, and every fault.
// The beam has one span.
func checkLoads(b Beam, loads []Load) ([]action, []error) {
	if n := len(loads); n < 1 || n > MaxLoads {
		return nil, []error{outside("loads", units.None, float64(n), 1, MaxLoads)}
	}
	var faults []error
	actions := make([]action, len(loads))
	length := b.Spans[0].Length.In(units.Metre)
	for i, l := range loads {
		path := func(field string) string { return fmt.Sprintf("loads[%d].%s", i, field) }
		if l.Case == "" {
			faults = append(faults, &FieldError{Field: path("case"), Allowed: "the id of a case"})
		}
		if l.Span < 0 || l.Span > len(b.Spans) {
			faults = append(faults, outside(path("span"), units.None, float64(l.Span), 0, float64(len(b.Spans))))
		}
		a, bad, known := actionOf(l.Shape, length)
		if !known {
			faults = append(faults, &FieldError{
				Field: path("shape"), Value: fmt.Sprintf("%T", l.Shape),
				Allowed: "Uniform, Partial, Point or Couple",
			})
		}
		for _, e := range bad {
			e.Field = path(e.Field)
			faults = append(faults, e)
		}
		actions[i] = a
	}
	return actions, faults
}
