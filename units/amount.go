package units

// An Amount is a quantity whose dimension is known only when the program
// runs, or a plain number. It carries values of any kind through results and
// views; formulas use the typed quantities. Amounts can be compared with ==.
// The zero value is the plain number 0.
type Amount struct {
	dim Dimension
	si  float64
}

// Plain returns a plain number, such as a ratio or a strain.
func Plain(v float64) Amount { return Amount{None, v} }

// Amount returns a, as the method of the typed quantities does.
func (a Amount) Amount() Amount { return a }

// Dimension returns the dimension of a, [None] for a plain number.
func (a Amount) Dimension() Dimension { return a.dim }

// SI returns a in the SI unit of its dimension.
func (a Amount) SI() float64 { return a.si }

// Plain returns a as a plain number, and false if a has a dimension.
func (a Amount) Plain() (float64, bool) {
	if a.dim != None {
		return 0, false
	}
	return a.si, true
}

// In returns a in the unit of the given symbol. Its error, if the symbol is
// not one of a's dimension, is a *[ParseError].
func (a Amount) In(symbol string) (float64, error) {
	if a.dim == None && symbol == "" {
		return a.si, nil
	}
	u, ok := a.dim.find(symbol)
	if !ok {
		return 0, wrongUnit(a.dim, symbol, symbol)
	}
	return a.si / u.factor, nil
}

// IsZero reports whether a is zero, of whatever dimension.
func (a Amount) IsZero() bool { return a.si == 0 }

// IsFinite reports whether a is neither infinite nor NaN.
func (a Amount) IsFinite() bool { return isFinite(a.si) }

// Compare returns -1, 0 or 1 as a is less than, equal to or greater than b,
// and false if their dimensions differ.
func (a Amount) Compare(b Amount) (int, bool) {
	if a.dim != b.dim {
		return 0, false
	}
	return compare(a.si, b.si), true
}

// Scale returns a times the plain number k.
func (a Amount) Scale(k float64) Amount { return Amount{a.dim, a.si * k} }

// Ratio returns a / b, and false if their dimensions differ.
func (a Amount) Ratio(b Amount) (float64, bool) {
	if a.dim != b.dim {
		return 0, false
	}
	return a.si / b.si, true
}

// AtMost reports whether a and b are of one dimension and a meets the upper
// limit b in the sense of the function [AtMost].
func (a Amount) AtMost(b Amount) bool { return a.dim == b.dim && AtMost(a.si, b.si) }

// String returns a in its SI unit at 12 significant digits.
func (a Amount) String() string {
	if a.dim == None {
		return formatIn(a.si, "")
	}
	return formatIn(a.si, symbolOf(a.dim, 0))
}

// MarshalJSON returns the lossless record {"value": ..., "unit": ...} in the SI
// unit, or a number if a is a plain number.
func (a Amount) MarshalJSON() ([]byte, error) { return marshalJSON(a.dim, a.si) }

// ParseAmount reads text as a quantity of dimension d, such as "26 ft 6 in",
// or as a number if d is [None]. Its error is a *[ParseError].
func ParseAmount(d Dimension, text string) (Amount, error) {
	v, err := parse(d, text)
	if err != nil {
		return Amount{}, err
	}
	return Amount{d, v}, nil
}

// AmountOf makes an amount of dimension d from a number, written as in JSON,
// and the symbol of a unit, which for plain numbers is empty. Its error is a
// *[ParseError].
func AmountOf(d Dimension, value, symbol string) (Amount, error) {
	v, err := valueOf(d, value, symbol)
	if err != nil {
		return Amount{}, err
	}
	return Amount{d, v}, nil
}

// assign returns a function that stores a value unless it comes with an error.
func assign(to *float64) func(float64, error) error {
	return func(v float64, err error) error {
		if err == nil {
			*to = v
		}
		return err
	}
}
