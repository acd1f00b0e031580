package bars_test

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/bars"
	"soffit.example/units"
)

// Worked by hand: an arithmetic sequence on either side of the web.
func TestSpread(t *testing.T) {
	s := bars.Spread{Size: size(t, "astm-inch", "#5"), From: inches(3), To: inches(9), Pitch: inches(8), Left: 2, Right: 1, Y: inches(2.5)}
	before := []bars.Placed{{Layer: 7}}
	got, err := s.Append(before)
	require.NoError(t, err)
	require.Equal(t, before[0], got[0])
	require.Len(t, got, 4)
	for i, x := range []float64{-13, -5, 17} {
		b := got[1+i]
		require.Equal(t, "#5", b.Size.Name)
		require.Equal(t, 1, b.Layer)
		require.InEpsilon(t, x, b.X.In(units.Inch), 1e-12)
		require.InEpsilon(t, 2.5, b.Y.In(units.Inch), 1e-12)
	}
	require.InEpsilon(t, 8-0.625, got[1].Clear(&got[2]).In(units.Inch), 1e-12)

	s.Left, s.Right = 0, 0
	got, err = s.Append(nil)
	require.NoError(t, err)
	require.Empty(t, got)

	s = bars.Spread{Size: bundle(t, "astm-inch", "2x#5"), Pitch: units.Metre.Of(100), Left: bars.MaxBars, Right: bars.MaxBars}
	got, err = s.Append(nil)
	require.NoError(t, err, "a web of one bar at its left face")
	require.Len(t, got, 2*bars.MaxBars)
	require.InEpsilon(t, -100*bars.MaxBars, got[0].X.In(units.Metre), 1e-12)
	require.InEpsilon(t, 100*bars.MaxBars, got[len(got)-1].X.In(units.Metre), 1e-12)
	require.Len(t, got[0].AppendSingles(nil), 2)
}

func TestSpreadRefuses(t *testing.T) {
	good := bars.Spread{Size: size(t, "astm-inch", "#5"), From: inches(3), To: inches(9), Pitch: inches(8), Left: 2, Right: 1, Y: inches(2.5)}
	metres := units.Metre.Of
	above := math.Nextafter(100, 101)
	for _, row := range []struct {
		name                  string
		harm                  func(*bars.Spread)
		field, value, allowed string
	}{
		{"no size", func(s *bars.Spread) { s.Size = bars.Size{} }, "size.diameter", "0 m", "more than 0 m, at most 1 m"},
		{"from outside", func(s *bars.Spread) { s.From = metres(-1) }, "from", "-1 m", "0 m to 100 m"},
		{"from not a number", func(s *bars.Spread) { s.From = metres(math.NaN()) }, "from", metres(math.NaN()).String(), "0 m to 100 m"},
		{"to far", func(s *bars.Spread) { s.To = metres(above) }, "to", metres(above).String(), "0 m to 100 m"},
		{"to before from", func(s *bars.Spread) { s.To = metres(0) }, "to", "0 m", "at least from, " + inches(3).String()},
		{"no pitch", func(s *bars.Spread) { s.Pitch = metres(0) }, "pitch", "0 m", "more than 0 m, at most 100 m"},
		{"negative pitch", func(s *bars.Spread) { s.Pitch = metres(-2) }, "pitch", "-2 m", "more than 0 m, at most 100 m"},
		{"endless pitch", func(s *bars.Spread) { s.Pitch = metres(math.Inf(1)) }, "pitch", metres(math.Inf(1)).String(), "more than 0 m, at most 100 m"},
		{"negative left", func(s *bars.Spread) { s.Left = -1 }, "left", "-1", "0 to 1000"},
		{"many left", func(s *bars.Spread) { s.Left = 1001 }, "left", "1001", "0 to 1000"},
		{"negative right", func(s *bars.Spread) { s.Right = -1 }, "right", "-1", "0 to 1000"},
		{"many right", func(s *bars.Spread) { s.Right = 1001 }, "right", "1001", "0 to 1000"},
		{"below the face", func(s *bars.Spread) { s.Y = metres(-1) }, "y", "-1 m", "0 m to 100 m"},
		{"far up", func(s *bars.Spread) { s.Y = metres(101) }, "y", "101 m", "0 m to 100 m"},
	} {
		t.Run(row.name, func(t *testing.T) {
			s := good
			row.harm(&s)
			got, err := s.Append(nil)
			var e *bars.RangeError
			require.ErrorAs(t, err, &e)
			require.Equal(t, bars.RangeError{Field: row.field, Value: row.value, Allowed: row.allowed}, *e)
			require.Empty(t, got)
		})
	}
}
