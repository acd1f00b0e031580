package bars

import (
	"math"
	"strconv"

	"soffit.example/units"
)

// Closed is the length of bar in a one-piece closed stirrup of a width and a
// depth out to out: three corners of 90 degrees, and at the fourth two equal
// hooks round the corner bar. It is measured along the bar's centre line with
// bends as arcs. The error is a *[RangeError] if a side is too short for its
// bends.
func Closed(width, depth units.Length, hook Hook) (units.Length, error) {
	if err := sides(hook.Bend, width, depth); err != nil {
		return units.Length{}, err
	}
	l := width.Add(depth).Scale(2)
	l = l.Sub(hook.Deduction().Scale(3))
	return l.Add(hook.Allowance().Scale(2)), nil
}

// Open is the length of bar in a U-shaped stirrup of a width and a depth out
// to out with equal hooks at the tops of its legs, measured as in [Closed].
func Open(width, depth units.Length, hook Hook) (units.Length, error) {
	if err := sides(hook.Bend, width, depth); err != nil {
		return units.Length{}, err
	}
	l := width.Add(depth.Scale(2))
	l = l.Sub(hook.Deduction().Scale(2))
	return l.Add(hook.Allowance().Scale(2)), nil
}

// CrossTie is the length of bar in a straight tie of a length out to out with
// a hook at each end, measured as in [Closed].
func CrossTie(length units.Length, a, b Hook) (units.Length, error) {
	if room := a.Setback().Add(b.Setback()); !(length.IsFinite() && room.AtMost(length)) {
		return units.Length{}, outside("tie length", length, "at least "+room.String()+" for its bends")
	}
	return length.Add(a.Allowance()).Add(b.Allowance()), nil
}

// Incline is a straight stretch of bar that rises at an angle to the axis of
// the beam, between centre lines: its length, rise / sin a, and its run along
// the beam, rise / tan a. It serves bent-up bars and inclined stirrups. The
// rise is 0 to 100 m, the angle 1 to 90 degrees; the error is a *[RangeError].
func Incline(rise units.Length, degrees float64) (length, run units.Length, err error) {
	if v := rise.In(units.Metre); !(v >= 0 && v <= maxWidth) {
		return units.Length{}, units.Length{}, outside("rise", rise, "0 m to 100 m")
	}
	if !(degrees >= 1 && degrees <= 90) {
		return units.Length{}, units.Length{}, &RangeError{Field: "angle", Value: formatFactor(degrees) + " degrees", Allowed: "1 to 90 degrees"}
	}
	if degrees == 90 {
		return rise, units.Length{}, nil // sin and tan of pi/2 are not exact
	}
	sin, cos := math.Sincos(degrees * math.Pi / 180)
	return rise.Scale(1 / sin), rise.Scale(cos / sin), nil
}

// sides checks that two sides have room for a bend at each end.
func sides(b Bend, width, depth units.Length) error {
	room := b.Setback().Scale(2)
	for _, side := range [...]struct {
		name   string
		length units.Length
	}{{"stirrup width", width}, {"stirrup depth", depth}} {
		if !(side.length.IsFinite() && room.AtMost(side.length)) {
			return outside(side.name, side.length, "at least "+room.String()+" for its bends")
		}
	}
	return nil
}

// StirrupForm is the form of a stirrup's outer piece.
type StirrupForm uint8

const (
	ClosedForm StirrupForm = iota + 1 // see Closed
	OpenForm                          // see Open
)

func (f StirrupForm) String() string {
	switch f {
	case ClosedForm:
		return "closed"
	case OpenForm:
		return "open"
	}
	return "unknown form"
}

// StirrupSet is what stands at one place along the beam: an outer stirrup
// and, for more than two legs, a cross tie for each leg between.
type StirrupSet struct {
	Size         Size
	Form         StirrupForm
	Width, Depth units.Length // out to out, the depth upright
	Legs         int          // 2 to 20
	// Angle is that between the stirrup's plane and the axis of the beam in
	// degrees, 1 to 90; zero means 90. The legs of an inclined stirrup are
	// longer: the centre lines of its level sides stand as far apart upright
	// as those of an upright one.
	Angle float64
	// HookAngle is that of the outer stirrup's hooks in degrees; zero means
	// 135. Cross ties have a 135-degree hook at one end and a 90-degree hook
	// at the other.
	HookAngle int
}

// StirrupLengths are the cut lengths of a stirrup set.
type StirrupLengths struct {
	Outer units.Length // of the outer stirrup
	Tie   units.Length // of each cross tie; zero without any
	Ties  int
	Total units.Length
}

const maxLegs = 20

// Lengths are the cut lengths of the set, with the standard hooks of its
// size. The error is a *[NoRuleError] if the catalog has no rule for one of
// the hooks, or a *[RangeError].
func (s StirrupSet) Lengths() (StirrupLengths, error) {
	if s.Legs < 2 || s.Legs > maxLegs {
		return StirrupLengths{}, &RangeError{Field: "legs", Value: strconv.Itoa(s.Legs), Allowed: "2 to " + strconv.Itoa(maxLegs)}
	}
	angle := s.HookAngle
	if angle == 0 {
		angle = 135
	}
	hook, err := s.Size.Hook(Stirrup, angle)
	if err != nil {
		return StirrupLengths{}, err
	}
	if s.Depth, err = s.slope(); err != nil {
		return StirrupLengths{}, err
	}
	l := StirrupLengths{Ties: s.Legs - 2}
	switch s.Form {
	case ClosedForm:
		l.Outer, err = Closed(s.Width, s.Depth, hook)
	case OpenForm:
		l.Outer, err = Open(s.Width, s.Depth, hook)
	default:
		err = &RangeError{Field: "form", Value: s.Form.String(), Allowed: "closed or open"}
	}
	if err != nil {
		return StirrupLengths{}, err
	}
	if l.Ties > 0 {
		if l.Tie, err = s.tie(); err != nil {
			return StirrupLengths{}, err
		}
	}
	l.Total = l.Outer.Add(l.Tie.Scale(float64(l.Ties)))
	return l, nil
}

// slope is the depth out to out in the plane of the stirrup.
func (s StirrupSet) slope() (units.Length, error) {
	if s.Angle == 0 || s.Angle == 90 {
		return s.Depth, nil
	}
	upright := s.Depth.Sub(s.Size.Diameter)
	if v := upright.In(units.Metre); !(v > 0 && v <= maxWidth) {
		return units.Length{}, outside("stirrup depth", s.Depth, "more than its bar, at most 100 m")
	}
	legs, _, err := Incline(upright, s.Angle)
	return legs.Add(s.Size.Diameter), err
}

// tie is the length of one cross tie, as deep as the stirrup.
func (s StirrupSet) tie() (units.Length, error) {
	seismic, err := s.Size.Hook(Stirrup, 135)
	if err != nil {
		return units.Length{}, err
	}
	plain, err := s.Size.Hook(Stirrup, 90)
	if err != nil {
		return units.Length{}, err
	}
	return CrossTie(s.Depth, seismic, plain)
}
