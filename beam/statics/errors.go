package statics

import (
	"fmt"

	"soffit.example/units"
)

// A RangeError tells of a quantity outside its allowed range.
type RangeError struct {
	Field       string       // such as "loads[2].at"; indices count from 0
	Value       units.Amount // as given
	Least, Most units.Amount // the allowed range
	LeastOpen   bool         // Least itself is not allowed
}

func (e *RangeError) Error() string {
	if e.Least == e.Most {
		return fmt.Sprintf("%s is %v: allowed is %v", e.Field, e.Value, e.Least)
	}
	if e.LeastOpen {
		return fmt.Sprintf("%s is %v: allowed is more than %v and at most %v", e.Field, e.Value, e.Least, e.Most)
	}
	return fmt.Sprintf("%s is %v: allowed is %v to %v", e.Field, e.Value, e.Least, e.Most)
}

// A FieldError tells of a value that is not a quantity and is not allowed.
type FieldError struct {
	Field   string // such as "supports[0].kind"; indices count from 0
	Value   string // as given
	Allowed string // what would be accepted, in words
}

func (e *FieldError) Error() string {
	return fmt.Sprintf("%s is %q: allowed is %s", e.Field, e.Value, e.Allowed)
}

// A SpanCountError tells that a beam has more spans than this version analyses.
type SpanCountError struct {
	Spans int
}

func (e *SpanCountError) Error() string {
	return fmt.Sprintf("spans: the beam has %d spans, and only one span is analysed in this version", e.Spans)
}

// A MechanismError tells that the supports leave the beam free to move.
type MechanismError struct {
	Motion string // the free motion, in words
}

func (e *MechanismError) Error() string {
	return "supports: the beam is a mechanism: " + e.Motion
}

// outside builds the RangeError of a value that lies outside least to most, all
// three in the SI unit of dim.
func outside(field string, dim units.Dimension, value, least, most float64) *RangeError {
	of := units.Plain
	switch dim {
	case units.DimLength:
		of = func(v float64) units.Amount { return units.Metre.Of(v).Amount() }
	case units.DimRigidity:
		of = func(v float64) units.Amount { return units.NewtonSquareMetre.Of(v).Amount() }
	case units.DimLineLoad:
		of = func(v float64) units.Amount { return units.NewtonPerMetre.Of(v).Amount() }
	case units.DimForce:
		of = func(v float64) units.Amount { return units.Newton.Of(v).Amount() }
	case units.DimMoment:
		of = func(v float64) units.Amount { return units.NewtonMetre.Of(v).Amount() }
	}
	return &RangeError{Field: field, Value: of(value), Least: of(least), Most: of(most)}
}
