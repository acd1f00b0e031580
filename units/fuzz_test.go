package units_test

import (
	"encoding/json"
	"errors"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/units"
)

var fuzzTexts = []string{
	"24 in", "26 ft 6 in", "3/4 in", "1 1/2 in", "24in", "-1 1/2 in", "26 ft 6.75 in", "1.5e3 mm", "0e99 m", "-0 m",
	"24", "", "NaN in", "0x1p4 in", "1e2000000000 in", "1_000 mm", "1,5 m", "\uff12 in", "\u22125 in", "1/0 in",
	"1e30 ft", "1e-30 m", "123456789012.345678 mm", "99999999 ft 11 999999/999999 in", "0.0004 1/in", "1/2 1/m",
	"150 pcf", "80 psf", "250 kip-ft", "4.5 ksi", "0.02 in2/in",
}

// requireReadable holds what was read against what is promised of it.
func requireReadable(t *testing.T, a units.Amount) {
	t.Helper()
	require.True(t, a.IsFinite())
	for _, s := range []units.System{units.SI, units.US} {
		text := s.Format(a)
		again, err := units.ParseAmount(a.Dimension(), text)
		if err != nil {
			// Printed in a smaller or greater unit than it was read in, an
			// extreme number may leave the range that is read.
			require.ErrorContains(t, err, "is out of range")
			continue
		}
		require.Equal(t, text, s.Format(again), "printing is a fixed point")
	}
}

func requireParseError(t *testing.T, d units.Dimension, err error) {
	t.Helper()
	var pe *units.ParseError
	require.True(t, errors.As(err, &pe), "%T", err)
	require.Equal(t, d, pe.Dimension)
	require.NotEmpty(t, pe.Reason)
	require.LessOrEqual(t, len(pe.Text), 64)
	require.Less(t, len(pe.Reason), 600)
}

func FuzzParseLength(f *testing.F) {
	for _, text := range fuzzTexts {
		f.Add(text)
	}
	f.Fuzz(func(t *testing.T, text string) {
		l, err := units.ParseLength(text)
		if err != nil {
			requireParseError(t, units.DimLength, err)
			require.Zero(t, l)
			return
		}
		requireReadable(t, l.Amount())
		record, err := l.MarshalText()
		require.NoError(t, err)
		again, err := units.ParseLength(string(record))
		require.NoError(t, err)
		require.Equal(t, l, again)
	})
}

func FuzzParseAmount(f *testing.F) {
	for i, text := range fuzzTexts {
		f.Add(byte(i%18), text)
		f.Add(byte(units.DimStress), text)
	}
	f.Fuzz(func(t *testing.T, dimension byte, text string) {
		d := units.Dimension(dimension)
		a, err := units.ParseAmount(d, text)
		if err != nil {
			requireParseError(t, d, err)
			require.Zero(t, a)
			return
		}
		require.Equal(t, d, a.Dimension())
		requireReadable(t, a)
	})
}

func FuzzUnmarshal(f *testing.F) {
	for _, text := range fuzzTexts {
		quoted, err := json.Marshal(text)
		require.NoError(f, err)
		f.Add(quoted)
	}
	for _, text := range []string{
		`{"value":24,"unit":"in"}`, `{"unit":"in","value":-2.5e-3}`, `24`, `null`, `[1]`, `{}`, `{"value":24}`,
		`{"value":24,"unit":"in","unit":"ft"}`, `{"value":{},"unit":"in"}`, `{"value":24,"unit":"in"} 5`, `{`, `"`,
		"\"0m\"\f", "\t24\r\n",
	} {
		f.Add([]byte(text))
	}
	f.Fuzz(func(t *testing.T, data []byte) {
		var l units.Length
		if err := l.UnmarshalJSON(data); err != nil {
			requireParseError(t, units.DimLength, err)
			require.Zero(t, l)
			return
		}
		require.True(t, json.Valid(data))
		requireReadable(t, l.Amount())
		record, err := json.Marshal(l)
		require.NoError(t, err)
		var again units.Length
		require.NoError(t, json.Unmarshal(record, &again))
		require.Equal(t, l, again)
	})
}
