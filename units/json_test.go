package units_test

import (
	"encoding/json"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/units"
)

func TestUnmarshalJSON(t *testing.T) {
	for _, tt := range []struct{ name, text string }{
		{"object", `{"value":24,"unit":"in"}`},
		{"object, other order and spaces", ` { "unit" : "in" , "value" : 2.4e1 } `},
		{"object with escapes", `{"v\u0061lue":24,"unit":"\u0069n"}`},
		{"string", `"24 in"`},
		{"feet and inches", `"2 ft 0 in"`},
		{"string with escapes", `"24\u0020in"`},
	} {
		t.Run(tt.name, func(t *testing.T) {
			var l units.Length
			require.NoError(t, json.Unmarshal([]byte(tt.text), &l))
			require.Equal(t, units.Inch.Of(24), l)
		})
	}
}

func TestUnmarshalJSONRefuses(t *testing.T) {
	const eg = `e.g. "14 in" or "350 mm"`
	for _, tt := range []struct{ name, text, want string }{
		{"bare number", `24`, "needs a unit, " + eg},
		{"bare negative number", `-2.4e1`, "needs a unit, " + eg},
		{"number as a string", `"24"`, "needs a unit, " + eg},
		{"null", `null`, `must be an object with "value" and "unit", or a string, ` + eg},
		{"true", `true`, `must be an object with "value" and "unit", or a string, ` + eg},
		{"array", `[24,"in"]`, `must be an object with "value" and "unit", or a string, ` + eg},
		{"empty object", `{}`, `lacks "value"`},
		{"no unit", `{"value":24}`, `lacks "unit"`},
		{"no value", `{"unit":"in"}`, `lacks "value"`},
		{"empty unit", `{"value":24,"unit":""}`, "needs a unit, " + eg},
		{"unknown key", `{"value":24,"unit":"in","note":"x"}`, `has the unknown key "note" beside "value" and "unit"`},
		{"key in another case", `{"Value":24,"unit":"in"}`, `has the unknown key "Value" beside "value" and "unit"`},
		{"long key", `{"` + strings.Repeat("k", 99) + `":1}`, `has the unknown key "` + strings.Repeat("k", 32) + `" beside "value" and "unit"`},
		{"duplicate value", `{"value":24,"value":25,"unit":"in"}`, `has the key "value" twice`},
		{"duplicate unit", `{"unit":"in","value":24,"unit":"in"}`, `has the key "unit" twice`},
		{"value as a string", `{"value":"24","unit":"in"}`, `has a "value" that is not a number`},
		{"value null", `{"value":null,"unit":"in"}`, `has a "value" that is not a number`},
		{"value an object", `{"value":{},"unit":"in"}`, `has a "value" that is not a number`},
		{"unit a number", `{"value":24,"unit":1}`, `has a "unit" that is not a string`},
		{"unit null", `{"value":24,"unit":null}`, `has a "unit" that is not a string`},
		{"wrong dimension", `{"value":24,"unit":"psi"}`, `has the unit "psi", which is of stress; units of length are m, mm, cm, in or ft`},
		{"huge", `{"value":1e2000000000,"unit":"in"}`, "has an exponent beyond 99; write " + eg},
		{"full-width digits", `"２４ in"`, `has the character '\uff12'; write it in plain ASCII, ` + eg},
	} {
		t.Run(tt.name, func(t *testing.T) {
			kept := units.Inch.Of(7)
			err := json.Unmarshal([]byte(tt.text), &kept)
			require.EqualError(t, err, tt.want)
			require.Equal(t, units.Inch.Of(7), kept)
			var pe *units.ParseError
			require.ErrorAs(t, err, &pe)
			require.Equal(t, units.DimLength, pe.Dimension)
		})
	}
}

// Called without a decoder in front, the method meets what is not JSON.
func TestUnmarshalJSONDirectly(t *testing.T) {
	for _, text := range []string{
		``, ` `, `{`, `{"value"`, `{"value":`, `{"value":24`, `{"value":24,"unit":"in"`, `{"value":24,"unit":"in"}}`,
		`{"value":24,"unit":"in"} 5`, `"24 in`, `"24 in" "24 in"`, `24 in`, `{24:"in"}`, `{"value" 24}`, `{"value":24 "unit":"in"}`, "\x00",
	} {
		t.Run(text, func(t *testing.T) {
			var l units.Length
			var pe *units.ParseError
			require.ErrorAs(t, l.UnmarshalJSON([]byte(text)), &pe)
			require.Zero(t, l)
		})
	}
}

func TestMarshalJSON(t *testing.T) {
	tenth, fifth := 0.1, 0.2 // variables, so that the sum is binary
	sum := tenth + fifth
	b, err := json.Marshal(struct {
		Width    units.Length `json:"width"`
		Strength units.Stress `json:"strength"`
	}{units.Metre.Of(0.6096), units.Pascal.Of(31.5e6)})
	require.NoError(t, err)
	require.Equal(t, `{"width":{"value":0.6096,"unit":"m"},"strength":{"value":31500000,"unit":"Pa"}}`, string(b))

	b, err = json.Marshal(units.Plain(sum))
	require.NoError(t, err)
	require.Equal(t, `0.30000000000000004`, string(b))
	b, err = json.Marshal(units.PerMillimetre.Of(2.5e-12).Amount())
	require.NoError(t, err)
	require.Equal(t, `{"value":2.5e-9,"unit":"1/m"}`, string(b))
	text, err := units.Metre.Of(0.6096).MarshalText()
	require.NoError(t, err)
	require.Equal(t, "0.6096 m", string(text))

	// What could not be read back is not written.
	_, err = units.Metre.Of(1e31).MarshalText()
	require.EqualError(t, err, "units: cannot record 1e+31: not of a magnitude from 1e-30 to 1e+30")
	_, err = json.Marshal(units.Metre.Of(1e-31))
	require.ErrorContains(t, err, "cannot record 1e-31")
}

func TestMeasureJSON(t *testing.T) {
	tenth, fifth := 0.1, 0.2
	for _, tt := range []struct {
		name string
		m    units.Measure
		want string
	}{
		{"quantity", units.US.Express(units.Inch.Of(24).Amount()), `{"value":24,"unit":"in"}`},
		{"no binary noise", units.US.Express(units.Inch.Of(0.75).Amount()), `{"value":0.75,"unit":"in"}`},
		{"plain number", units.US.Express(units.Plain(tenth + fifth)), `0.3`},
		{"negative", units.Foot.Express(units.Inch.Of(-6)), `{"value":-0.5,"unit":"ft"}`},
		{"symbol with a slash", units.US.Express(units.PerInch.Of(4e-4).Amount()), `{"value":0.0004,"unit":"1/in"}`},
		{"small", units.US.Express(units.PerInch.Of(4e-9).Amount()), `{"value":4e-9,"unit":"1/in"}`},
	} {
		t.Run(tt.name, func(t *testing.T) {
			b, err := json.Marshal(tt.m)
			require.NoError(t, err)
			require.Equal(t, tt.want, string(b))
			var back units.Measure
			require.NoError(t, json.Unmarshal(b, &back))
			require.Equal(t, tt.m, back)
		})
	}
	for _, bad := range []units.Measure{
		{}, {Number: "NaN"}, {Number: "+Inf", Unit: "in"}, {Number: "5 "}, {Number: "[]"}, {Number: `"5"`},
	} {
		_, err := json.Marshal(bad)
		require.ErrorContains(t, err, "cannot be written as a number")
	}
	for _, bad := range []string{`null`, `"24 in"`, `{"value":24}`, `[24]`} {
		var m units.Measure
		require.Error(t, json.Unmarshal([]byte(bad), &m), bad)
	}
}

func TestSeriesJSON(t *testing.T) {
	moments := []units.Moment{units.KipFoot.Of(0), units.KipFoot.Of(20.1), units.KipFoot.Of(-1.0 / 3)}
	b, err := json.Marshal(units.SeriesOf(units.US, moments))
	require.NoError(t, err)
	require.Equal(t, `{"unit":"kip-ft","values":[0,20.1,-0.333333333333]}`, string(b))

	b, err = json.Marshal(units.SeriesOf(units.SI, []units.Length(nil)))
	require.NoError(t, err)
	require.Equal(t, `{"unit":"mm","values":[]}`, string(b), "an empty series keeps its unit")

	b, err = json.Marshal(units.SeriesOf(units.SI, []units.Amount{units.Plain(0.5), units.Plain(1)}))
	require.NoError(t, err)
	require.Equal(t, `{"values":[0.5,1]}`, string(b))

	mixed := units.SeriesOf(units.SI, []units.Amount{units.Plain(0.5), units.Metre.Of(1).Amount()})
	_, err = json.Marshal(mixed)
	require.ErrorContains(t, err, "value 1 of a series is NaN")
}
