package mechanics

import (
	"fmt"

	"soffit.example/units"
)

// An InputError is a value that the mechanics cannot work with.
type InputError struct {
	Field   string // as a path into the argument, e.g. "layers[1].area"
	Value   string // as given, with its unit
	Allowed string // the allowed range, with its unit
}

func (e *InputError) Error() string {
	return fmt.Sprintf("%s is %s; allowed: %s", e.Field, e.Value, e.Allowed)
}

// A NoEquilibriumError says that no depth of the neutral axis balances the
// section with its compression face at the ultimate strain: there is no steel
// to take the tension, or the axial force is outside what the section can
// balance. All forces are compression positive.
type NoEquilibriumError struct {
	Sense       Sense
	Axial       units.Force // asked for
	Least, Most units.Force // with the neutral axis at the compression face, and infinitely far
}

func (e *NoEquilibriumError) Error() string {
	return fmt.Sprintf("no equilibrium in %s: an axial force of %s (compression positive) is not between %s and %s, the limits of the section",
		e.Sense, e.Axial, e.Least, e.Most)
}

// An UnreachableError says that no area of steel at the given place gives the
// moment asked for.
type UnreachableError struct {
	Moment   units.Moment // asked for
	Greatest units.Moment // the greatest found
}

func (e *UnreachableError) Error() string {
	return fmt.Sprintf("no area of steel gives a moment of %s: the greatest is %s", e.Moment, e.Greatest)
}

func checkNumber(field string, value, low, high float64) error {
	if !(value >= low && value <= high) {
		return &InputError{Field: field, Value: fmt.Sprint(value), Allowed: fmt.Sprintf("from %.6g to %.6g", low, high)}
	}
	return nil
}

func checkStress(field string, s units.Stress) error {
	if !stressInRange(s) {
		return &InputError{Field: field, Value: s.String(), Allowed: stressRange}
	}
	return nil
}

const stressRange = "from 1e-6 to 1e9 MPa"

func stressInRange(s units.Stress) bool {
	v := s.In(units.Pascal)
	return v >= leastStress && v <= mostStress
}
