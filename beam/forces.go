package beam

import "soffit.example/units"

// Action is what one combination asks of one section.
type Action struct {
	Combination string
	Span        int // 1-based; zero for a demand given directly
	At          units.Length
	Moment      units.Moment
	Shear       units.Force
	Torque      units.Moment
	Axial       units.Force
}

// Forces are the factored forces of a problem: of every combination along
// every span, or the demands that the caller gave.
type Forces struct {
	spans   []spanForces
	demands []Action
}

// Demands lists the demands that the caller gave in place of spans.
func (f *Forces) Demands() []Action { return f.demands }

// Spans is the number of analysed spans; zero with demands given directly.
func (f *Forces) Spans() int { return len(f.spans) }

// Moment is the action with the largest moment of a sense between two
// positions of a span, at its true position. ok is false where no
// combination bends that way. With demands given directly span and positions
// are ignored.
func (f *Forces) Moment(s Sense, span int, from, to units.Length) (a Action, ok bool) {
	panic("soon")
}

// Shear is the action with the largest magnitude of shear between two
// positions of a span.
func (f *Forces) Shear(span int, from, to units.Length) (a Action, ok bool) {
	panic("soon")
}

// Combinations is the number of combinations analysed, which Action counts
// through from zero.
func (f *Forces) Combinations() int { panic("soon") }

// Action is what combination i asks at a position of a span, with its shear
// and moment simultaneous; where a force jumps, right picks the side.
func (f *Forces) Action(i, span int, at units.Length, right bool) Action {
	panic("soon")
}

// Breaks appends the positions in a span where the shear or moment of any
// combination changes its expression: supports, loads, load ends.
func (f *Forces) Breaks(dst []units.Length, span int) []units.Length {
	panic("soon")
}

type spanForces struct{}
