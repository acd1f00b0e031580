package statics

import (
	"fmt"

	"soffit.example/units"
)

// Bounds on what Analyze accepts. They are far outside any real beam and keep
// every sum of a legal beam finite.
const (
	minLength    = 1e-3 // m, of a span
	maxLength    = 1e5  // m, of a span
	maxRigidity  = 1e18 // N-m2
	maxMagnitude = 1e12 // N/m, N or N-m, of a load, up or down
	maxFactor    = 1e6  // of a case in a combination
)

// SupportKind says what a support holds. The zero value is none of them, so
// that a support left out is told from one that is free.
type SupportKind uint8

const (
	Pinned SupportKind = iota + 1 // holds the beam up and down, lets it turn
	Roller                        // as Pinned; they would differ only under axial force
	Fixed                         // holds the beam up and down and keeps it from turning
	Free                          // holds nothing: the end of a cantilever
)

// String returns the kind's name in lower case.
func (k SupportKind) String() string {
	switch k {
	case Pinned:
		return "pinned"
	case Roller:
		return "roller"
	case Fixed:
		return "fixed"
	case Free:
		return "free"
	}
	return fmt.Sprintf("SupportKind(%d)", uint8(k))
}

// holds reports whether the support keeps the beam from moving up and down.
func (k SupportKind) holds() bool { return k == Pinned || k == Roller || k == Fixed }

// A Support stands at an end of a span.
type Support struct {
	Kind SupportKind
}

// A Span is one prismatic length of a beam between two supports.
type Span struct {
	Length units.Length // 1 mm to 100 km

	// Rigidity is E times I, 0 to 1e18 N-m2. Zero leaves it out.
	// Forces depend only on the ratios between spans, so those of a single
	// span do not depend on it.
	Rigidity units.Rigidity
}

// A Beam is a row of spans, left to right, with a support at the left end of
// each and one more at the right end of the last.
type Beam struct {
	Spans    []Span
	Supports []Support
}

// check returns every fault of the beam's own fields.
func (b Beam) check() []error {
	if len(b.Spans) > 1 {
		return []error{&SpanCountError{Spans: len(b.Spans)}}
	}
	var faults []error
	if len(b.Spans) == 0 {
		faults = append(faults, outside("spans", units.None, 0, 1, 1))
	}
	for i, s := range b.Spans {
		if l := s.Length.In(units.Metre); !(units.AtMost(minLength, l) && units.AtMost(l, maxLength)) {
			faults = append(faults, outside(fmt.Sprintf("spans[%d].length", i), units.DimLength, l, minLength, maxLength))
		}
		if r := s.Rigidity.In(units.NewtonSquareMetre); !(0 <= r && r <= maxRigidity) {
			faults = append(faults, outside(fmt.Sprintf("spans[%d].rigidity", i), units.DimRigidity, r, 0, maxRigidity))
		}
	}
	if n, want := len(b.Supports), len(b.Spans)+1; n != want && len(b.Spans) > 0 {
		faults = append(faults, outside("supports", units.None, float64(n), float64(want), float64(want)))
	}
	for i, s := range b.Supports {
		if s.Kind < Pinned || s.Kind > Free {
			faults = append(faults, &FieldError{
				Field: fmt.Sprintf("supports[%d].kind", i), Value: s.Kind.String(),
				Allowed: "pinned, roller, fixed or free",
			})
		}
	}
	return faults
}

// stability returns a MechanismError if the supports of a single span let it
// move, and nil if they hold it.
func (b Beam) stability() error {
	left, right := b.Supports[0].Kind, b.Supports[1].Kind
	switch {
	case left.holds() && right.holds(), left == Fixed, right == Fixed:
		return nil
	case left.holds():
		return &MechanismError{Motion: fmt.Sprintf("it turns about support 1 (%v), because support 2 is free", left)}
	case right.holds():
		return &MechanismError{Motion: fmt.Sprintf("it turns about support 2 (%v), because support 1 is free", right)}
	}
	return &MechanismError{Motion: "it falls and turns, because both of its ends are free"}
}
