package units_test

import (
	"math/big"
	"math/rand/v2"
	"strconv"
	"strings"
	"testing"

	"github.com/shopspring/decimal"
	"github.com/stretchr/testify/require"

	"soffit.example/units"
)

func TestParseLength(t *testing.T) {
	for _, tt := range []struct {
		text string
		want units.Length
	}{
		{"24 in", units.Inch.Of(24)},
		{"24in", units.Inch.Of(24)},
		{"  24   in  ", units.Inch.Of(24)},
		{"+24 in", units.Inch.Of(24)},
		{"-24 in", units.Inch.Of(-24)},
		{"024 in", units.Inch.Of(24)},
		{"0.75 in", units.Inch.Of(0.75)},
		{".75 in", units.Inch.Of(0.75)},
		{"24. in", units.Inch.Of(24)},
		{"3/4 in", units.Inch.Of(0.75)},
		{"-3/4 in", units.Inch.Of(-0.75)},
		{"3/4in", units.Inch.Of(0.75)},
		{"1 1/2 in", units.Inch.Of(1.5)},
		{"-1 1/2 in", units.Inch.Of(-1.5)},
		{"12345678 123456/654321 in", units.Inch.Of(12345678 + 123456.0/654321)},
		{"1/3 ft", units.Foot.Of(1.0 / 3)},
		{"1.5e3 mm", units.Millimetre.Of(1500)},
		{"1.5E+3 mm", units.Millimetre.Of(1500)},
		{"15e-1mm", units.Millimetre.Of(1.5)},
		{"0e99 mm", units.Length{}},
		{"0 ft", units.Length{}},
		{"26 ft 6 in", units.Inch.Of(318)},
		{"26ft6in", units.Inch.Of(318)},
		{"26 ft 6.75 in", units.Inch.Of(318.75)},
		{"26 ft 6 3/4 in", units.Inch.Of(318.75)},
		{"26 ft 3/4 in", units.Inch.Of(312.75)},
		{"26 ft 0.1 in", units.Inch.Of(312.1)},
		{"-26 ft 6 in", units.Inch.Of(-318)},
		{"0 ft 11 15/16 in", units.Inch.Of(11.9375)},
		{"3 m", units.Metre.Of(3)},
		{"35 cm", units.Centimetre.Of(35)},
		{"1e30 m", units.Metre.Of(1e30)},
		{"1e-30 m", units.Metre.Of(1e-30)},
		{strings.Repeat("0", 39) + "7 in", units.Inch.Of(7)},
	} {
		t.Run(tt.text, func(t *testing.T) {
			got, err := units.ParseLength(tt.text)
			require.NoError(t, err)
			require.Equal(t, tt.want, got)
			var again units.Length
			require.NoError(t, again.UnmarshalText([]byte(tt.text)))
			require.Equal(t, got, again)
		})
	}
}

func TestParseOtherDimensions(t *testing.T) {
	for _, tt := range []struct {
		dimension units.Dimension
		text      string
		want      units.Amount
	}{
		{units.None, "0.9", units.Plain(0.9)},
		{units.None, "-3/4", units.Plain(-0.75)},
		{units.None, "1 1/4", units.Plain(1.25)},
		{units.DimStress, "4500 psi", units.PSI.Of(4500).Amount()},
		{units.DimStress, "30 N/mm2", units.Megapascal.Of(30).Amount()},
		{units.DimMoment, "250 kip-ft", units.KipFoot.Of(250).Amount()},
		{units.DimLineLoad, "1.4 klf", units.KipPerFoot.Of(1.4).Amount()},
		{units.DimLineLoad, "1400 plf", units.PoundPerFoot.Of(1400).Amount()},
		{units.DimDensity, "150 pcf", units.PoundPerCubicFoot.Of(150).Amount()},
		{units.DimUnitWeight, "150 pcf", units.PoundForcePerCubicFoot.Of(150).Amount()},
		{units.DimAreaLoad, "4 kN/m2", units.KilonewtonPerSquareMetre.Of(4).Amount()},
		{units.DimForce, "10 lb", units.PoundForce.Of(10).Amount()},
		{units.DimMass, "10 lb", units.PoundMass.Of(10).Amount()},
		{units.DimCurvature, "0.0004 1/in", units.PerInch.Of(0.0004).Amount()},
		{units.DimCurvature, "5 1/m", units.PerMetre.Of(5).Amount()},
		{units.DimCurvature, "1/2 1/m", units.PerMetre.Of(0.5).Amount()},
		{units.DimCurvature, "3 1/2 1/ft", units.PerFoot.Of(3.5).Amount()},
	} {
		t.Run(tt.dimension.String()+" "+tt.text, func(t *testing.T) {
			got, err := units.ParseAmount(tt.dimension, tt.text)
			require.NoError(t, err)
			require.Equal(t, tt.want, got)
		})
	}
}

func TestParseRefuses(t *testing.T) {
	const (
		list = "m, mm, cm, in or ft"
		eg   = `e.g. "14 in" or "350 mm"`
	)
	for _, tt := range []struct{ name, text, want string }{
		{"bare number", "24", "needs a unit, " + eg},
		{"bare fraction", "1 1/2", "needs a unit, " + eg},
		{"empty", "", "is empty; write " + eg},
		{"spaces", "   ", "is empty; write " + eg},
		{"unit alone", "in", "does not begin with a number; write " + eg},
		{"point alone", ". in", "does not begin with a number; write " + eg},
		{"sign alone", "- in", "does not begin with a number; write " + eg},
		{"two signs", "--5 in", "does not begin with a number; write " + eg},
		{"sign apart", "- 5 in", "does not begin with a number; write " + eg},
		{"NaN", "NaN in", "does not begin with a number; write " + eg},
		{"infinity", "Inf in", "does not begin with a number; write " + eg},
		{"signed infinity", "-Infinity in", "does not begin with a number; write " + eg},
		{"hexadecimal", "0x18 in", `has the unknown unit "x18 in"; units of length are ` + list},
		{"full-width digits", "\uff12\uff14 in", `has the character '\uff12'; write it in plain ASCII, ` + eg},
		{"minus sign of typesetting", "\u22125 in", `has the character '\u2212'; write it in plain ASCII, ` + eg},
		{"prime", "5\u2032", `has the character '\u2032'; write it in plain ASCII, ` + eg},
		{"no-break space", "24\u00a0in", `has the character '\u00a0'; write it in plain ASCII, ` + eg},
		{"tab", "24\tin", `has the character '\t'; write it in plain ASCII, ` + eg},
		{"invalid UTF-8", "24 \xffin", `has the character '\ufffd'; write it in plain ASCII, ` + eg},
		{"zero byte", "24 in\x00", `has the character '\x00'; write it in plain ASCII, ` + eg},
		{"underscore", "1_000 mm", `has "_" in its number, which is written with digits and one decimal point; write ` + eg},
		{"comma", "1,000 mm", `has "," in its number, which is written with digits and one decimal point; write ` + eg},
		{"decimal comma", "0,5 m", `has "," in its number, which is written with digits and one decimal point; write ` + eg},
		{"two points", "1.2.3 mm", `has "." in its number, which is written with digits and one decimal point; write ` + eg},
		{"unknown unit", "24 inches", `has the unknown unit "inches"; units of length are ` + list},
		{"a length", "24 in/ft", `has the unit "in/ft", which is of length over length (multiply by the length that it acts on); units of length are ` + list},
		{"wrong case", "24 MM", `has the unknown unit "MM" (write "mm": symbols are case-sensitive); units of length are ` + list},
		{"wrong dimension", "24 psi", `has the unit "psi", which is of stress; units of length are ` + list},
		{"wrong dimension, alias", "24 plf", `has the unit "plf", which is of line load; units of length are ` + list},
		{"symbol of two dimensions", "24 lb", `has the unit "lb", which is of force or mass; units of length are ` + list},
		{"product of units", "24 in*in", `has the unknown unit "in*in"; units of length are ` + list},
		{"second unit", "24 in in", `has the unknown unit "in in"; units of length are ` + list},
		{"something after", "24 in;", `has the unknown unit "in;"; units of length are ` + list},
		{"exponent without digits", "1e in", `has the unknown unit "e in"; units of length are ` + list},
		{"huge exponent", "1e2000000000 in", "has an exponent beyond 99; write " + eg},
		{"tiny exponent", "1e-2000000000 in", "has an exponent beyond 99; write " + eg},
		{"exponent beyond int", "1e99999999999999999999 in", "has an exponent beyond 99; write " + eg},
		{"huge", "1.1e30 m", "is out of range; magnitudes from 1e-30 to 1e+30 are read"},
		{"tiny", "0.9e-30 m", "is out of range; magnitudes from 1e-30 to 1e+30 are read"},
		{"tiny in the SI unit", "1e-30 mm", "is out of range; magnitudes from 1e-30 to 1e+30 are read"},
		{"long number", strings.Repeat("1", 41) + " in", "has a number of more than 40 characters; write " + eg},
		{"long text", strings.Repeat(" ", 65), "is 65 bytes long; at most 64 are read, " + eg},
		{"fraction over zero", "1/0 in", "has a fraction over zero; write " + eg},
		{"fraction of decimals", "1/2.5 in", "has a fraction of numbers that are not whole; write " + eg},
		{"decimal numerator", "1.5/2 in", `has the unknown unit "/2 in"; units of length are ` + list},
		{"spaced fraction", "3 / 4 in", `has the unknown unit "/ 4 in"; units of length are ` + list},
		{"long fraction", "1/1234567 in", "has a fraction with more digits than are read (8 before it, 6 in each part); write " + eg},
		{"two numbers", "1 2 in", `has the unknown unit "2 in"; units of length are ` + list},
		{"decimal feet before inches", "26.5 ft 6 in", `has feet before its inches that are not a whole number of at most 8 digits; write e.g. "26 ft 6 in"`},
		{"fraction of feet before inches", "1/2 ft 6 in", `has feet before its inches that are not a whole number of at most 8 digits; write e.g. "26 ft 6 in"`},
		{"many feet before inches", "123456789 ft 6 in", `has feet before its inches that are not a whole number of at most 8 digits; write e.g. "26 ft 6 in"`},
		{"twelve inches after feet", "26 ft 12 in", `has inches after its feet that are signed or not below 12; write e.g. "26 ft 6 in"`},
		{"signed inches after feet", "26 ft -6 in", `has inches after its feet that are signed or not below 12; write e.g. "26 ft 6 in"`},
		{"feet and something", "26 ft 6", `has something other than inches after its feet; write e.g. "26 ft 6 in"`},
		{"feet and millimetres", "26 ft 6 mm", `has something other than inches after its feet; write e.g. "26 ft 6 in"`},
		{"feet and feet", "26 ft 6 ft", `has something other than inches after its feet; write e.g. "26 ft 6 in"`},
		{"feet and a broken number", "26 ft 1,5 in", `has inches where "1,5 in" has "," in its number, which is written with digits and one decimal point; write e.g. "26 ft 6 in"`},
		{"inches and feet", "6 in 26 ft", `has the unknown unit "in 26 ft"; units of length are ` + list},
		{"feet and no number", "26 ft in", `has the unknown unit "ft in"; units of length are ` + list},
		{"markup", `<b>5</b> in`, "does not begin with a number; write " + eg},
	} {
		t.Run(tt.name, func(t *testing.T) {
			l, err := units.ParseLength(tt.text)
			require.EqualError(t, err, tt.want)
			require.Zero(t, l)
			var pe *units.ParseError
			require.ErrorAs(t, err, &pe)
			require.Equal(t, units.DimLength, pe.Dimension)
			require.Equal(t, []string{"m", "mm", "cm", "in", "ft"}, pe.Accepted)
			require.LessOrEqual(t, len(pe.Text), 64)
			require.True(t, strings.HasPrefix(tt.text, pe.Text), pe.Text)
		})
	}
}

func TestParseRefusesOtherDimensions(t *testing.T) {
	for _, tt := range []struct {
		dimension  units.Dimension
		text, want string
	}{
		{units.None, "0.9 in", `is a plain number and takes no unit; "in" is not read`},
		{units.None, "90%", `is a plain number and takes no unit; "%" is not read`},
		{units.DimMoment, "250 kip*ft", `has the unknown unit "kip*ft"; units of moment are N-m, kN-m, N-mm, lb-in, lb-ft, kip-in or kip-ft`},
		{units.DimMoment, "250 ft-kip", `has the unknown unit "ft-kip"; units of moment are N-m, kN-m, N-mm, lb-in, lb-ft, kip-in or kip-ft`},
		{units.DimStress, "60 KSI", `has the unknown unit "KSI" (write "ksi": symbols are case-sensitive); units of stress are Pa, kPa, MPa, GPa, psi or ksi`},
		{units.DimStress, "80 psf", `has the unit "psf", which is of area load; units of stress are Pa, kPa, MPa, GPa, psi or ksi`},
		{units.DimForce, "26 ft 6 in", `has the unknown unit "ft 6 in"; units of force are N, kN, MN, lb or kip`},
		{units.DimCurvature, "1/m", `has the unknown unit "/m"; units of curvature are 1/m, 1/mm, 1/in or 1/ft`},
		{units.DimArea, "3.16", `needs a unit, e.g. "3.16 in2" or "2040 mm2"`},
	} {
		t.Run(tt.dimension.String()+" "+tt.text, func(t *testing.T) {
			_, err := units.ParseAmount(tt.dimension, tt.text)
			require.EqualError(t, err, tt.want)
		})
	}
}

func TestAmountOf(t *testing.T) {
	a, err := units.AmountOf(units.DimLength, "24", "in")
	require.NoError(t, err)
	require.Equal(t, units.Inch.Of(24).Amount(), a)
	a, err = units.AmountOf(units.None, "-9e-1", "")
	require.NoError(t, err)
	require.Equal(t, units.Plain(-0.9), a)

	for _, tt := range []struct{ name, value, symbol, want string }{
		{"no unit", "24", "", `needs a unit, e.g. "14 in" or "350 mm"`},
		{"unknown unit", "24", "inch", `has the unknown unit "inch"; units of length are m, mm, cm, in or ft`},
		{"long unknown unit", "24", strings.Repeat("x", 99), `has the unknown unit "` + strings.Repeat("x", 64) + `"; units of length are m, mm, cm, in or ft`},
		{"spaces about the unit", "24", " in ", `has the unknown unit " in "; units of length are m, mm, cm, in or ft`},
		{"empty", "", "in", `has a value that is not a number of at most 40 characters, e.g. "14 in" or "350 mm"`},
		{"fraction", "3/4", "in", `has a value that is not a number of at most 40 characters, e.g. "14 in" or "350 mm"`},
		{"plus", "+5", "in", `has a value that is not a number of at most 40 characters, e.g. "14 in" or "350 mm"`},
		{"leading zero", "05", "in", `has a value that is not a number of at most 40 characters, e.g. "14 in" or "350 mm"`},
		{"space", " 5", "in", `has a value that is not a number of at most 40 characters, e.g. "14 in" or "350 mm"`},
		{"NaN", "NaN", "in", `has a value that is not a number of at most 40 characters, e.g. "14 in" or "350 mm"`},
		{"long", strings.Repeat("1", 41), "in", `has a value that is not a number of at most 40 characters, e.g. "14 in" or "350 mm"`},
		{"huge exponent", "1e2000000000", "in", `has an exponent beyond 99; write e.g. "14 in" or "350 mm"`},
		{"huge", "1e31", "in", "is out of range; magnitudes from 1e-30 to 1e+30 are read"},
	} {
		t.Run(tt.name, func(t *testing.T) {
			a, err := units.AmountOf(units.DimLength, tt.value, tt.symbol)
			require.EqualError(t, err, tt.want)
			require.Zero(t, a)
			var pe *units.ParseError
			require.ErrorAs(t, err, &pe)
		})
	}
	_, err = units.AmountOf(units.None, "24", "in")
	require.EqualError(t, err, `is a plain number and takes no unit; "in" is not read`)
}

// The obvious way to read a number is arbitrary-precision decimal; what is
// read must be the float64 nearest to it, for every form.
func TestParseAgainstDecimal(t *testing.T) {
	count := 100_000
	if testing.Short() {
		count /= 20
	}
	rng := rand.New(rand.NewPCG(2, 1))
	digits := func(least, most int) string {
		var b strings.Builder
		for range least + rng.IntN(most-least+1) {
			b.WriteByte(byte('0' + rng.IntN(10)))
		}
		return b.String()
	}
	for range count {
		text := digits(1, 20) + "." + digits(0, 12)
		if rng.IntN(2) == 0 {
			text += "e" + strconv.Itoa(rng.IntN(16)-8)
		}
		want := decimal.RequireFromString(strings.TrimSuffix(text, "."))
		got, err := units.ParseAmount(units.None, text)
		require.NoError(t, err, text)
		if got.SI() != want.InexactFloat64() {
			require.Equal(t, want.InexactFloat64(), got.SI(), text)
		}
	}
	for range count {
		feet, whole := rng.Int64N(1e8), rng.Int64N(11)
		den := 1 + rng.Int64N(999_999)
		num := rng.Int64N(den)
		text := strconv.FormatInt(feet, 10) + " ft " + strconv.FormatInt(whole, 10) + " " +
			strconv.FormatInt(num, 10) + "/" + strconv.FormatInt(den, 10) + " in"
		sum := big.NewRat(num, den)
		sum.Add(sum, new(big.Rat).SetInt64(12*feet+whole))
		inches, _ := sum.Float64()
		got, err := units.ParseLength(text)
		require.NoError(t, err, text)
		if got != units.Inch.Of(inches) {
			require.Equal(t, units.Inch.Of(inches), got, text)
		}
	}
}
