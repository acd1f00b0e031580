package units_test

import (
	"encoding/json"
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/units"
)

// quantity is what every quantity type T with unit U can do.
type quantity[T, U any] interface {
	comparable
	In(U) float64
	Add(T) T
	Sub(T) T
	Neg() T
	Abs() T
	Scale(float64) T
	Ratio(T) float64
	Compare(T) int
	Less(T) bool
	AtMost(T) bool
	Max(T) T
	Min(T) T
	IsZero() bool
	IsFinite() bool
	Amount() units.Amount
	String() string
	MarshalText() ([]byte, error)
	MarshalJSON() ([]byte, error)
}

type unitOf[T any] interface {
	~uint8
	Of(float64) T
	Format(T) string
	Express(T) units.Measure
	String() string
}

// checkQuantity holds one generated type against what all of them promise.
func checkQuantity[T quantity[T, U], U unitOf[T]](t *testing.T, d units.Dimension,
	parse func(string) (T, error), getter func(units.Amount) (T, bool), list []U) {
	t.Helper()
	var zero T
	si := list[0]
	three, five := si.Of(3), si.Of(5)

	require.True(t, zero.IsZero())
	require.Equal(t, zero, si.Of(0))
	require.Equal(t, si.Of(8), three.Add(five))
	require.Equal(t, si.Of(-2), three.Sub(five))
	require.Equal(t, si.Of(-3), three.Neg())
	require.Equal(t, three, three.Neg().Abs())
	require.Equal(t, si.Of(7.5), three.Scale(2.5))
	require.Equal(t, 0.6, three.Ratio(five))
	require.Equal(t, []int{-1, 0, 1}, []int{three.Compare(five), five.Compare(five), five.Compare(three)})
	require.True(t, three.Less(five))
	require.False(t, five.Less(five))
	require.True(t, five.AtMost(five))
	require.True(t, si.Of(5*(1+1e-10)).AtMost(five))
	require.False(t, si.Of(5*(1+1e-8)).AtMost(five))
	require.Equal(t, five, three.Max(five))
	require.Equal(t, three, three.Min(five))
	require.True(t, five.IsFinite())
	for _, v := range []float64{math.NaN(), math.Inf(1), math.Inf(-1)} {
		require.False(t, si.Of(v).IsFinite())
		_, err := si.Of(v).MarshalText()
		require.Error(t, err)
		_, err = si.Of(v).MarshalJSON()
		require.Error(t, err)
	}

	require.Equal(t, d, three.Amount().Dimension())
	require.Equal(t, 3.0, three.Amount().SI())
	back, ok := getter(three.Amount())
	require.True(t, ok)
	require.Equal(t, three, back)
	_, ok = getter(units.Plain(3))
	require.False(t, ok)

	symbols := d.Units()
	require.Len(t, list, len(symbols))
	require.Equal(t, "3 "+symbols[0], three.String())
	for i, u := range list {
		require.Equal(t, symbols[i], u.String())
		require.Equal(t, "0.75 "+symbols[i], u.Format(u.Of(0.75)))
		require.Equal(t, units.Measure{Number: "0.75", Unit: symbols[i]}, u.Express(u.Of(0.75)))
		require.InEpsilon(t, 0.75, u.Of(0.75).In(u), 4e-16)
		got, err := parse("0.75 " + symbols[i])
		require.NoError(t, err)
		require.Equal(t, u.Of(0.75), got)
	}

	// A value that names no unit makes what no check can take for a result.
	none := U(len(list))
	require.False(t, none.Of(1).IsFinite())
	require.True(t, math.IsNaN(three.In(none)))
	require.Equal(t, "unknown unit", none.String())

	v := list[len(list)-1].Of(1.0 / 3)
	text, err := v.MarshalText()
	require.NoError(t, err)
	record, err := json.Marshal(v)
	require.NoError(t, err)
	var fromText, fromRecord, fromString T
	require.NoError(t, any(&fromText).(interface{ UnmarshalText([]byte) error }).UnmarshalText(text))
	require.NoError(t, json.Unmarshal(record, &fromRecord))
	require.NoError(t, json.Unmarshal([]byte(`"`+string(text)+`"`), &fromString))
	require.Equal(t, v, fromText)
	require.Equal(t, v, fromRecord)
	require.Equal(t, v, fromString)

	kept := v
	require.Error(t, json.Unmarshal([]byte("24"), &kept))
	require.Equal(t, v, kept, "a refused value must leave the old one")
}

// requireClose requires got to be want but for the last bit.
func requireClose(t *testing.T, want, got units.Amount) {
	t.Helper()
	require.Equal(t, want.Dimension(), got.Dimension())
	require.InEpsilon(t, want.SI(), got.SI(), 4e-16)
}

func TestAtMost(t *testing.T) {
	inf, nan := math.Inf(1), math.NaN()
	tenth, fifth := 0.1, 0.2 // variables, so that the sum is binary
	for _, tt := range []struct {
		name string
		a, b float64
		want bool
	}{
		{"below", 1, 2, true},
		{"equal", 2, 2, true},
		{"above within tolerance", 2 * (1 + 0.9e-9), 2, true},
		{"above beyond tolerance", 2 * (1 + 1.1e-9), 2, false},
		{"negative within tolerance", -2 * (1 - 0.9e-9), -2, true},
		{"negative beyond tolerance", -2 * (1 - 1.1e-9), -2, false},
		{"zero meets zero", 0, 0, true},
		{"zero has no slack", 1e-300, 0, false},
		{"sum of tenths", tenth + fifth, 0.3, true},
		{"infinite above finite", inf, 5, false},
		{"finite above minus infinite", 5, -inf, false},
		{"infinite meets infinite", inf, inf, true},
		{"difference overflows", math.MaxFloat64, -math.MaxFloat64, false},
		{"NaN demand", nan, 1, false},
		{"NaN limit", 1, nan, false},
	} {
		t.Run(tt.name, func(t *testing.T) { require.Equal(t, tt.want, units.AtMost(tt.a, tt.b)) })
	}
}

// Two bars, their gap and two covers fill a width exactly: in binary they are
// a bit wider than it or narrower, by order of the sum and the unit.
func TestAtMostWidthMetExactly(t *testing.T) {
	cover, bar, gap := units.Inch.Of(1.9), units.Inch.Of(1.27), units.Inch.Of(3.16)
	need := cover.Add(bar).Add(gap).Add(bar).Add(cover)
	require.True(t, need.AtMost(units.Inch.Of(9.5)))
	require.True(t, units.Inch.Of(9.5).AtMost(need))
}

func TestAmount(t *testing.T) {
	width := units.Inch.Of(14).Amount()
	require.Equal(t, units.DimLength, width.Dimension())
	require.Equal(t, units.Amount{}, units.Plain(0))
	require.Equal(t, "0.9", units.Plain(0.9).String())
	require.Equal(t, "0.3556 m", width.String())
	require.True(t, units.Amount{}.IsZero())
	require.False(t, units.Plain(math.NaN()).IsFinite())

	v, ok := units.Plain(0.9).Plain()
	require.True(t, ok)
	require.Equal(t, 0.9, v)
	_, ok = width.Plain()
	require.False(t, ok)

	in, err := width.In("in")
	require.NoError(t, err)
	require.InEpsilon(t, 14, in, 4e-16)
	_, err = width.In("psi")
	require.EqualError(t, err, `has the unit "psi", which is of stress; units of length are m, mm, cm, in or ft`)
	_, err = width.In("")
	require.Error(t, err)
	plain, err := units.Plain(0.9).In("")
	require.NoError(t, err)
	require.Equal(t, 0.9, plain)

	half := width.Scale(0.5)
	c, ok := half.Compare(width)
	require.True(t, ok)
	require.Equal(t, -1, c)
	_, ok = half.Compare(units.Plain(1))
	require.False(t, ok)
	r, ok := half.Ratio(width)
	require.True(t, ok)
	require.Equal(t, 0.5, r)
	_, ok = units.Pascal.Of(1).Amount().Ratio(units.NewtonPerSquareMetre.Of(1).Amount())
	require.False(t, ok, "stress and area load are not one dimension")
	require.True(t, half.AtMost(width))
	require.False(t, width.AtMost(half))
	require.False(t, half.AtMost(units.Plain(1e9)))

	same := map[units.Amount]bool{width: true}
	require.True(t, same[units.Inch.Of(14).Amount()], "equal amounts are equal keys")
}

func TestDimension(t *testing.T) {
	require.Equal(t, "plain number", units.None.String())
	require.Equal(t, "second moment of area", units.DimSecondMoment.String())
	require.Equal(t, "unknown dimension", units.Dimension(200).String())
	require.Empty(t, units.None.Units())
	require.Empty(t, units.Dimension(200).Units())
	require.Equal(t, [2]string{"14 in", "350 mm"}, units.DimLength.Examples())
	require.Empty(t, units.Dimension(200).Examples())
	mass, length, time := units.DimMoment.Exponents()
	require.Equal(t, []int{1, 2, -2}, []int{mass, length, time})
	mass, length, time = units.Dimension(200).Exponents()
	require.Equal(t, []int{0, 0, 0}, []int{mass, length, time})

	_, err := units.ParseAmount(units.Dimension(200), "5 in")
	require.Error(t, err)
	_, err = units.AmountOf(units.Dimension(200), "5", "in")
	require.Error(t, err)

	for d := units.None; d.String() != "unknown dimension"; d++ {
		for _, text := range d.Examples() {
			a, err := units.ParseAmount(d, text)
			require.NoError(t, err, "%s example of messages", d)
			require.Equal(t, d, a.Dimension())
		}
	}
}

// A pound of mass weighs a pound of force under standard gravity.
func TestWeight(t *testing.T) {
	requireClose(t, units.PoundForce.Of(150).Amount(), units.PoundMass.Of(150).Weight().Amount())
	requireClose(t, units.PoundPerFoot.Of(2.67).Amount(), units.PoundMassPerFoot.Of(2.67).Weight().Amount())
	requireClose(t, units.PoundForcePerCubicFoot.Of(150).Amount(), units.PoundPerCubicFoot.Of(150).Weight().Amount())
	requireClose(t, units.PoundPerCubicFoot.Of(150).Amount(), units.PoundForcePerCubicFoot.Of(150).Density().Amount())
	// 1 kgf = 9.80665 N (NIST SP 811, appendix B.8).
	require.Equal(t, units.Newton.Of(9.80665), units.Kilogram.Of(1).Weight())

	// A 16 in by 26 in rectangle of 150 lb/ft3 weighs 16*26/144*150 lb/ft.
	area := units.Inch.Of(16).MulLength(units.Inch.Of(26))
	requireClose(t, units.PoundPerFoot.Of(16.0*26/144*150).Amount(),
		units.PoundPerCubicFoot.Of(150).Weight().MulArea(area).Amount())
}
