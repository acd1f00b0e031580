package bars_test

import (
	"fmt"
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/bars"
	"soffit.example/units"
)

// pen draws the centre line of a bar as a chain of short chords, in mm.
type pen struct {
	x, y, heading          float64
	length                 float64
	left, right, low, high float64
}

func (p *pen) step(dx, dy float64) {
	p.x, p.y = p.x+dx, p.y+dy
	p.length += math.Hypot(dx, dy)
	p.left, p.right = min(p.left, p.x), max(p.right, p.x)
	p.low, p.high = min(p.low, p.y), max(p.high, p.y)
}

func (p *pen) straight(l float64) {
	p.step(l*math.Cos(p.heading), l*math.Sin(p.heading))
}

// bend turns left about a centre at the given radius.
func (p *pen) bend(degrees, radius float64) {
	const chords = 2000
	turn := degrees * math.Pi / 180 / chords
	for range chords {
		p.heading += turn / 2
		p.straight(2 * radius * math.Sin(turn/2))
		p.heading += turn / 2
	}
}

// requireDrawn compares a cut length with the drawn line, and the drawn line
// with the dimensions it should have out to out.
func requireDrawn(t *testing.T, p *pen, bar, width, depth float64, got units.Length) {
	t.Helper()
	require.InDelta(t, width, p.right-p.left+bar, 1e-4, "width out to out")
	require.InDelta(t, depth, p.high-p.low+bar, 1e-4, "depth out to out")
	require.InDelta(t, p.length, got.In(units.Millimetre), 0.5)
}

func TestLengthsAsDrawn(t *testing.T) {
	for _, id := range []string{"astm-inch", "astm-metric", "en-10080"} {
		c, err := bars.Lookup(id)
		require.NoError(t, err)
		for _, s := range c.Sizes()[:5] {
			for _, angle := range []int{90, 135, 180} {
				t.Run(fmt.Sprintf("%s %s %d", id, s, angle), func(t *testing.T) {
					h, err := s.Hook(bars.Stirrup, angle)
					require.NoError(t, err)
					const width, depth = 640.0, 710.0
					bar := s.Diameter.In(units.Millimetre)
					inside := h.Inside.In(units.Millimetre) / 2
					radius, back := inside+bar/2, inside+bar
					tail, turn := h.Extension.In(units.Millimetre), float64(angle)

					p := &pen{heading: -math.Pi/2 - turn*math.Pi/180}
					p.straight(tail)
					p.bend(turn, radius)
					for i, side := range []float64{depth, width, depth, width} {
						p.straight(side - 2*back)
						if i < 3 {
							p.bend(90, radius)
						}
					}
					p.bend(turn, radius)
					p.straight(tail)
					closed, err := bars.Closed(millimetres(width), millimetres(depth), h)
					require.NoError(t, err)
					requireDrawn(t, p, bar, width, depth, closed)

					p = &pen{heading: -math.Pi/2 - turn*math.Pi/180}
					p.straight(tail)
					p.bend(turn, radius)
					for i, side := range []float64{depth, width, depth} {
						p.straight(side - 2*back)
						if i < 2 {
							p.bend(90, radius)
						}
					}
					p.bend(turn, radius)
					p.straight(tail)
					open, err := bars.Open(millimetres(width), millimetres(depth), h)
					require.NoError(t, err)
					requireDrawn(t, p, bar, width, depth, open)
				})
			}
		}
	}
}

func TestCrossTieAsDrawn(t *testing.T) {
	s := size(t, "astm-metric", "No. 13")
	a, err := s.Hook(bars.Stirrup, 135)
	require.NoError(t, err)
	b, err := s.Hook(bars.Stirrup, 90)
	require.NoError(t, err)
	p := &pen{heading: math.Pi/2 - 3*math.Pi/4}
	p.straight(76.2)
	p.bend(135, 2.5*12.7)
	p.straight(500 - 2*3*12.7)
	p.bend(90, 2.5*12.7)
	p.straight(76.2)
	got, err := bars.CrossTie(millimetres(500), a, b)
	require.NoError(t, err)
	require.InDelta(t, 500, p.high-p.low+12.7, 1e-4)
	require.InDelta(t, p.length, got.In(units.Millimetre), 0.5)
}

// BS 8666:2005 Table 3, from memory, takes r/2 + d off for each 90-degree
// bend: shape code 51, a closed link with 90-degree tails, is 2(A + B + C) -
// 2.5r - 5d. That rounds the exact deduction, by less than 0.1 d for r = 2d.
func TestClosedNearBS8666(t *testing.T) {
	for _, name := range []string{"8", "10", "12", "16"} {
		s := size(t, "en-10080", name)
		h, err := s.Hook(bars.Stirrup, 90)
		require.NoError(t, err)
		d, r := s.Diameter.In(units.Millimetre), h.Radius().In(units.Millimetre)
		require.InEpsilon(t, 2*d, r, 1e-12)
		tail := h.Extension.In(units.Millimetre) + r + d
		got, err := bars.Closed(millimetres(300), millimetres(600), h)
		require.NoError(t, err)
		require.InDelta(t, 2*(300+600+tail)-2.5*r-5*d, got.In(units.Millimetre), 5*0.1*d)
	}
}

func TestStirrupSet(t *testing.T) {
	s := size(t, "astm-inch", "#4")
	set := bars.StirrupSet{Size: s, Form: bars.ClosedForm, Width: inches(13), Depth: inches(23), Legs: 2}
	two, err := set.Lengths()
	require.NoError(t, err)
	require.Zero(t, two.Ties)
	require.Zero(t, two.Tie)
	require.Equal(t, two.Outer, two.Total)

	set.Legs = 5
	five, err := set.Lengths()
	require.NoError(t, err)
	require.Equal(t, 3, five.Ties)
	require.Equal(t, two.Outer, five.Outer)
	require.InEpsilon(t, two.Outer.Add(five.Tie.Scale(3)).In(units.Inch), five.Total.In(units.Inch), 1e-12)
	hook, err := s.Hook(bars.Stirrup, 135)
	require.NoError(t, err)
	end, err := s.Hook(bars.Stirrup, 90)
	require.NoError(t, err)
	tie, err := bars.CrossTie(inches(23), hook, end)
	require.NoError(t, err)
	require.Equal(t, tie, five.Tie)

	set.HookAngle = 90
	ninety, err := set.Lengths()
	require.NoError(t, err)
	require.True(t, ninety.Outer.Less(five.Outer))

	set.Form = bars.OpenForm
	open, err := set.Lengths()
	require.NoError(t, err)
	require.True(t, open.Outer.Less(ninety.Outer))
}

func TestStirrupRefuses(t *testing.T) {
	good := bars.StirrupSet{Size: size(t, "astm-inch", "#4"), Form: bars.ClosedForm, Width: inches(13), Depth: inches(23), Legs: 2}
	for _, row := range []struct {
		name string
		harm func(*bars.StirrupSet)
		want string
	}{
		{"one leg", func(s *bars.StirrupSet) { s.Legs = 1 }, "legs is 1, allowed: 2 to 20"},
		{"many legs", func(s *bars.StirrupSet) { s.Legs = 21 }, "legs is 21"},
		{"no form", func(s *bars.StirrupSet) { s.Form = 0 }, "form is unknown form, allowed: closed or open"},
		{"narrow", func(s *bars.StirrupSet) { s.Width = inches(2.9) }, "stirrup width is"},
		{"shallow", func(s *bars.StirrupSet) { s.Depth = units.Length{} }, "stirrup depth is 0 m, allowed: at least"},
		{"negative", func(s *bars.StirrupSet) { s.Form, s.Depth = bars.OpenForm, inches(-20) }, "stirrup depth"},
		{"not a number", func(s *bars.StirrupSet) { s.Width = units.Metre.Of(math.NaN()) }, "stirrup width"},
		{"infinite", func(s *bars.StirrupSet) { s.Width = units.Metre.Of(math.Inf(1)) }, "stirrup width"},
		{"no size", func(s *bars.StirrupSet) { s.Size = bars.Size{} }, "no bend rule for"},
		{"no hook", func(s *bars.StirrupSet) { s.HookAngle = 30 }, "no rule for a 30-degree hook for #4 as a stirrup"},
		{"hook unknown to the catalog", func(s *bars.StirrupSet) { s.Size = size(t, "as-nzs-4671", "N12") }, "no rule for a 135-degree hook for N12"},
	} {
		t.Run(row.name, func(t *testing.T) {
			set := good
			row.harm(&set)
			l, err := set.Lengths()
			require.ErrorContains(t, err, row.want)
			require.Zero(t, l)
		})
	}
	h, err := good.Size.Hook(bars.Stirrup, 135)
	require.NoError(t, err)
	_, err = bars.CrossTie(inches(2.9), h, h)
	require.ErrorContains(t, err, "tie length is")
}

// Closed forms: at 30 degrees the length is twice the rise, at 45 degrees the
// root of two times, and upright it is the rise.
func TestIncline(t *testing.T) {
	for _, row := range []struct{ degrees, length, run float64 }{
		{90, 1, 0}, {60, 2 / math.Sqrt(3), 1 / math.Sqrt(3)}, {45, math.Sqrt2, 1}, {30, 2, math.Sqrt(3)},
		{1, 57.298688498550185, 57.28996163075943}, // csc and cot of a degree, from a table
	} {
		length, run, err := bars.Incline(inches(20), row.degrees)
		require.NoError(t, err)
		require.InEpsilon(t, 20*row.length, length.In(units.Inch), 1e-14)
		require.InDelta(t, 20*row.run, run.In(units.Inch), 1e-11)
	}
	length, run, err := bars.Incline(inches(20), 90)
	require.NoError(t, err)
	require.Equal(t, inches(20), length)
	require.Zero(t, run)
	_, _, err = bars.Incline(units.Metre.Of(100), 1)
	require.NoError(t, err, "the limits themselves are allowed")
	length, _, err = bars.Incline(units.Length{}, 45)
	require.NoError(t, err)
	require.Zero(t, length)

	nan := math.NaN()
	for _, row := range []struct {
		rise    units.Length
		degrees float64
		want    bars.RangeError
	}{
		{units.Metre.Of(-1), 45, bars.RangeError{Field: "rise", Value: "-1 m", Allowed: "0 m to 100 m"}},
		{units.Metre.Of(101), 45, bars.RangeError{Field: "rise", Value: "101 m", Allowed: "0 m to 100 m"}},
		{units.Metre.Of(nan), 45, bars.RangeError{Field: "rise", Value: units.Metre.Of(nan).String(), Allowed: "0 m to 100 m"}},
		{units.Metre.Of(1), 0.5, bars.RangeError{Field: "angle", Value: "0.5 degrees", Allowed: "1 to 90 degrees"}},
		{units.Metre.Of(1), 90.5, bars.RangeError{Field: "angle", Value: "90.5 degrees", Allowed: "1 to 90 degrees"}},
		{units.Metre.Of(1), nan, bars.RangeError{Field: "angle", Value: "NaN degrees", Allowed: "1 to 90 degrees"}},
	} {
		length, run, err := bars.Incline(row.rise, row.degrees)
		var got *bars.RangeError
		require.ErrorAs(t, err, &got)
		require.Equal(t, row.want, *got)
		require.Zero(t, length)
		require.Zero(t, run)
	}
}

// Closed form: against an upright one, an inclined closed stirrup has two
// legs, an open one two and a cross tie one that are longer by (1/sin a - 1)
// times the upright distance between the centre lines of its level sides.
func TestInclinedStirrups(t *testing.T) {
	s := size(t, "astm-inch", "#4")
	for _, form := range []bars.StirrupForm{bars.ClosedForm, bars.OpenForm} {
		set := bars.StirrupSet{Size: s, Form: form, Width: inches(13), Depth: inches(23), Legs: 5}
		upright, err := set.Lengths()
		require.NoError(t, err)
		set.Angle = 90
		same, err := set.Lengths()
		require.NoError(t, err)
		require.Equal(t, upright, same)
		for _, degrees := range []float64{45, 60, 89.999999} {
			set.Angle = degrees
			inclined, err := set.Lengths()
			require.NoError(t, err)
			longer := 22.5 * (1/math.Sin(degrees*math.Pi/180) - 1)
			require.InDelta(t, 2*longer, inclined.Outer.Sub(upright.Outer).In(units.Inch), 1e-9)
			require.InDelta(t, longer, inclined.Tie.Sub(upright.Tie).In(units.Inch), 1e-9)
			require.InDelta(t, 5*longer, inclined.Total.Sub(upright.Total).In(units.Inch), 1e-9)
		}
	}
	for _, row := range []struct {
		name string
		harm func(*bars.StirrupSet)
		want bars.RangeError
	}{
		{"flat", func(s *bars.StirrupSet) { s.Angle = 0.9 }, bars.RangeError{Field: "angle", Value: "0.9 degrees", Allowed: "1 to 90 degrees"}},
		{"leaning over", func(s *bars.StirrupSet) { s.Angle = 135 }, bars.RangeError{Field: "angle", Value: "135 degrees", Allowed: "1 to 90 degrees"}},
		{"not a number", func(s *bars.StirrupSet) { s.Angle = math.NaN() }, bars.RangeError{Field: "angle", Value: "NaN degrees", Allowed: "1 to 90 degrees"}},
		{"no depth", func(s *bars.StirrupSet) { s.Depth = inches(0.5) }, bars.RangeError{Field: "stirrup depth", Value: inches(0.5).String(), Allowed: "more than its bar, at most 100 m"}},
		{"deep", func(s *bars.StirrupSet) { s.Depth = units.Metre.Of(101) }, bars.RangeError{Field: "stirrup depth", Value: "101 m", Allowed: "more than its bar, at most 100 m"}},
	} {
		t.Run(row.name, func(t *testing.T) {
			set := bars.StirrupSet{Size: s, Form: bars.ClosedForm, Width: inches(13), Depth: inches(23), Legs: 2, Angle: 45}
			row.harm(&set)
			l, err := set.Lengths()
			var got *bars.RangeError
			require.ErrorAs(t, err, &got)
			require.Equal(t, row.want, *got)
			require.Zero(t, l)
		})
	}
}
