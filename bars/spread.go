package bars

import (
	"strconv"

	"soffit.example/units"
)

// Spread is bars in a flange beside the web, going on outwards from the
// outermost bars of a layer in the web at a fixed pitch. Like everything laid
// in a [Cage], it is measured from the left face of the web and from the face
// at which the bars lie, so that bars left of the web have a negative X.
// Clear distances are not checked; [Placed.Clear] measures them.
type Spread struct {
	Size        Size
	From, To    units.Length // X of the outermost web bars, left and right
	Pitch       units.Length // between centres
	Left, Right int          // bars on either side, 0 to MaxBars
	Y           units.Length // of the centres, from the face
}

// Append appends the bars to dst from left to right, those left of the web
// before those right of it. They count as bars of layer 1. The error is a
// *[RangeError].
func (s Spread) Append(dst []Placed) ([]Placed, error) {
	if err := s.check(); err != nil {
		return dst, err
	}
	p := Placed{Size: s.Size, Y: s.Y, Layer: 1, body: s.Size.body()}
	for k := s.Left; k > 0; k-- {
		p.X = s.From.Sub(s.Pitch.Scale(float64(k)))
		dst = append(dst, p)
	}
	for k := 1; k <= s.Right; k++ {
		p.X = s.To.Add(s.Pitch.Scale(float64(k)))
		dst = append(dst, p)
	}
	return dst, nil
}

func (s Spread) check() error {
	if err := s.Size.Check(); err != nil {
		return err
	}
	within := func(l units.Length, low, high float64) bool {
		v := l.In(units.Metre)
		return v >= low && v <= high
	}
	switch {
	case !within(s.From, 0, maxWidth):
		return outside("from", s.From, "0 m to 100 m")
	case !within(s.To, 0, maxWidth):
		return outside("to", s.To, "0 m to 100 m")
	case s.To.Less(s.From):
		return outside("to", s.To, "at least from, "+s.From.String())
	case !within(s.Pitch, 0, maxWidth) || s.Pitch.IsZero():
		return outside("pitch", s.Pitch, "more than 0 m, at most 100 m")
	case s.Left < 0 || s.Left > MaxBars:
		return &RangeError{Field: "left", Value: strconv.Itoa(s.Left), Allowed: "0 to " + strconv.Itoa(MaxBars)}
	case s.Right < 0 || s.Right > MaxBars:
		return &RangeError{Field: "right", Value: strconv.Itoa(s.Right), Allowed: "0 to " + strconv.Itoa(MaxBars)}
	case !within(s.Y, 0, maxWidth):
		return outside("y", s.Y, "0 m to 100 m")
	}
	return nil
}
