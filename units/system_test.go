package units_test

import (
	"encoding/json"
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/units"
)

// The units that each system prints, one for each dimension.
func TestSystemUnits(t *testing.T) {
	for _, tt := range []struct {
		dimension units.Dimension
		si, us    string
	}{
		{units.None, "", ""},
		{units.DimLength, "mm", "in"},
		{units.DimArea, "mm2", "in2"},
		{units.DimSecondMoment, "mm4", "in4"},
		{units.DimSectionModulus, "mm3", "in3"},
		{units.DimVolume, "m3", "ft3"},
		{units.DimForce, "kN", "kip"},
		{units.DimLineLoad, "kN/m", "kip/ft"},
		{units.DimAreaLoad, "kPa", "psf"},
		{units.DimMoment, "kN-m", "kip-ft"},
		{units.DimStress, "MPa", "ksi"},
		{units.DimDensity, "kg/m3", "lb/ft3"},
		{units.DimUnitWeight, "kN/m3", "lb/ft3"},
		{units.DimMass, "kg", "lb"},
		{units.DimMassPerLength, "kg/m", "lb/ft"},
		{units.DimAreaPerLength, "mm2/mm", "in2/in"},
		{units.DimCurvature, "1/m", "1/in"},
		{units.DimRigidity, "kN-m2", "kip-in2"},
		{units.Dimension(200), "", ""},
	} {
		t.Run(tt.dimension.String(), func(t *testing.T) {
			require.Equal(t, tt.si, units.SI.Unit(tt.dimension))
			require.Equal(t, tt.us, units.US.Unit(tt.dimension))
		})
	}
	require.Empty(t, units.System(9).Unit(units.DimLength))
}

func TestSystemFormat(t *testing.T) {
	span := units.Foot.Of(27).Amount()
	require.Equal(t, "324 in", units.US.Format(span))
	require.Equal(t, "8229.6 mm", units.SI.Format(span))
	require.Equal(t, "27 ft", units.US.FormatIn(span, "ft"))
	require.Equal(t, "324 in", units.US.FormatIn(span, "psi"), "a unit of another dimension leaves the system's own")
	require.Equal(t, "27 ft", units.US.ExpressIn(span, "ft").String())
	require.Equal(t, "0.9", units.US.FormatIn(units.Plain(0.9), "ft"))
	require.Equal(t, "0.9", units.US.Express(units.Plain(0.9)).String())
	require.InEpsilon(t, 324, units.US.Float(span), 4e-16)
	require.Equal(t, "1.4 kip/ft", units.US.FormatIn(units.KipPerFoot.Of(1.4).Amount(), "klf"), "an alias prints as its symbol")
	require.Equal(t, "NaN in", units.US.Format(units.Inch.Of(math.NaN()).Amount()))
	require.Equal(t, "+Inf in", units.US.Format(units.Inch.Of(math.Inf(1)).Amount()))
}

func TestSystemText(t *testing.T) {
	for text, want := range map[string]units.System{"si": units.SI, "us": units.US} {
		got, err := units.ParseSystem(text)
		require.NoError(t, err)
		require.Equal(t, want, got)
		require.Equal(t, text, got.String())
		b, err := json.Marshal(got)
		require.NoError(t, err)
		var back units.System
		require.NoError(t, json.Unmarshal(b, &back))
		require.Equal(t, want, back)
	}
	for _, text := range []string{"", "US", "imperial", "metric"} {
		_, err := units.ParseSystem(text)
		require.ErrorContains(t, err, `must be "si" or "us"`, text)
	}
	s := units.US
	require.Error(t, s.UnmarshalText([]byte("xx")))
	require.Equal(t, units.US, s)
	require.Equal(t, "unknown system", units.System(9).String())
	_, err := units.System(9).MarshalText()
	require.Error(t, err)
}

// Expected texts are the values rounded by hand to 12 significant digits.
func TestPrintedNumber(t *testing.T) {
	negativeZero := math.Copysign(0, -1)
	for _, tt := range []struct {
		v    float64
		want string
	}{
		{0, "0"},
		{negativeZero, "0"},
		{1, "1"},
		{-1, "-1"},
		{10, "10"},
		{100000, "100000"},
		{0.1, "0.1"},
		{1.0 / 3, "0.333333333333"},
		{2.0 / 3, "0.666666666667"},
		{-200.0 / 3, "-66.6666666667"},
		{0.7499999999999999, "0.75"},
		{9.9999999999999, "10"},
		{999999999999.5, "1000000000000"},
		{123456789012, "123456789012"},
		{1234567890123, "1234567890120"},
		{123456789012345, "123456789012000"},
		{999999999999999, "1e15"},
		{1e14, "100000000000000"},
		{1e15, "1e15"},
		{1.5e15, "1.5e15"},
		{-1.25e22, "-1.25e22"},
		{1e300, "1e300"},
		{0.000001, "0.000001"},
		{0.00000123456789, "0.00000123456789"},
		{0.0000009999999999999, "0.000001"},
		{0.00000099, "9.9e-7"},
		{1e-7, "1e-7"},
		{-2.5e-10, "-2.5e-10"},
		{5e-324, "4.94065645841e-324"},
	} {
		t.Run(tt.want, func(t *testing.T) {
			require.Equal(t, tt.want, units.Plain(tt.v).String())
			require.Equal(t, tt.want, string(units.SI.Express(units.Plain(tt.v)).Number))
			require.True(t, json.Valid([]byte(tt.want)))
		})
	}
}
