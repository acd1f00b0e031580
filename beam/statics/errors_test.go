package statics_test

import (
	"errors"
	"fmt"
	"math"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/statics"
	"soffit.example/units"
)

func TestMechanisms(t *testing.T) {
	pinned, roller, fixed, free := statics.Pinned, statics.Roller, statics.Fixed, statics.Free
	for _, tc := range []struct {
		left, right statics.SupportKind
		motion      string
	}{
		{pinned, free, "turns about support 1 (pinned)"},
		{roller, free, "turns about support 1 (roller)"},
		{free, pinned, "turns about support 2 (pinned)"},
		{free, roller, "turns about support 2 (roller)"},
		{free, free, "falls and turns"},
	} {
		_, err := statics.Analyze(oneSpan(tc.left, 5, tc.right), one(uniform(1)))
		var mechanism *statics.MechanismError
		require.ErrorAs(t, err, &mechanism)
		require.Contains(t, mechanism.Motion, tc.motion)
		require.ErrorContains(t, err, "the beam is a mechanism: it "+tc.motion)
	}
	for _, ends := range [][2]statics.SupportKind{
		{pinned, pinned}, {roller, roller}, {fixed, free}, {free, fixed}, {fixed, roller}, {pinned, fixed}, {fixed, fixed},
	} {
		_, err := statics.Analyze(oneSpan(ends[0], 5, ends[1]), one(uniform(1)))
		require.NoError(t, err)
	}
}

func TestOnlyOneSpan(t *testing.T) {
	_, err := statics.Analyze(statics.Beam{
		Spans:    []statics.Span{{Length: m(5)}, {Length: m(5)}},
		Supports: []statics.Support{{Kind: statics.Pinned}, {Kind: statics.Roller}, {Kind: statics.Roller}},
	}, one(uniform(1)))
	var count *statics.SpanCountError
	require.ErrorAs(t, err, &count)
	require.Equal(t, 2, count.Spans)
	require.EqualError(t, err, "spans: the beam has 2 spans, and only one span is analysed in this version")
}

// shaped stands for a shape that the package does not know.
type shaped struct{ statics.Uniform }

func TestBadInput(t *testing.T) {
	nan, inf := math.NaN(), math.Inf(1)
	simple := oneSpan(statics.Pinned, 8, statics.Roller)
	for _, tc := range []struct {
		name  string
		beam  statics.Beam
		loads []statics.Load
		want  string // the whole message; one fault a line
	}{
		{"no spans", statics.Beam{}, one(uniform(1)), "spans is 0: allowed is 1"},
		{"too few supports", statics.Beam{Spans: simple.Spans, Supports: simple.Supports[:1]}, one(uniform(1)),
			"supports is 1: allowed is 2"},
		{"support left out", oneSpan(0, 8, statics.Roller), one(uniform(1)),
			`supports[0].kind is "SupportKind(0)": allowed is pinned, roller, fixed or free`},
		{"unknown support", oneSpan(statics.Pinned, 8, 99), one(uniform(1)),
			`supports[1].kind is "SupportKind(99)": allowed is pinned, roller, fixed or free`},
		{"negative length", oneSpan(statics.Pinned, -8, statics.Roller), one(uniform(1)),
			"spans[0].length is -8 m: allowed is 0.001 m to 100000 m"},
		{"zero length", oneSpan(statics.Pinned, 0, statics.Roller), one(uniform(1)),
			"spans[0].length is 0 m: allowed is 0.001 m to 100000 m"},
		{"huge length", oneSpan(statics.Pinned, 1e6, statics.Roller), one(uniform(1)),
			"spans[0].length is 1000000 m: allowed is 0.001 m to 100000 m"},
		{"length not a number", oneSpan(statics.Pinned, nan, statics.Roller), one(uniform(1)),
			"spans[0].length is NaN m: allowed is 0.001 m to 100000 m"},
		{"negative rigidity", statics.Beam{Supports: simple.Supports,
			Spans: []statics.Span{{Length: m(8), Rigidity: units.NewtonSquareMetre.Of(-1)}}}, one(uniform(1)),
			"spans[0].rigidity is -1 N-m2: allowed is 0 N-m2 to 1e18 N-m2"},
		{"no loads", simple, nil, "loads is 0: allowed is 1 to 10000"},
		{"too many loads", simple, make([]statics.Load, statics.MaxLoads+1), "loads is 10001: allowed is 1 to 10000"},
		{"no case", simple, []statics.Load{{Shape: uniform(1)}}, `loads[0].case is "": allowed is the id of a case`},
		{"no such span", simple, []statics.Load{{Case: "dead", Span: 2, Shape: uniform(1)}}, "loads[0].span is 2: allowed is 0 to 1"},
		{"negative span", simple, []statics.Load{{Case: "dead", Span: -1, Shape: uniform(1)}}, "loads[0].span is -1: allowed is 0 to 1"},
		{"no shape", simple, []statics.Load{{Case: "dead"}},
			`loads[0].shape is "<nil>": allowed is Uniform, Partial, Point or Couple`},
		{"pointer to a shape", simple, []statics.Load{{Case: "dead", Shape: (*statics.Uniform)(nil)}},
			`loads[0].shape is "*statics.Uniform": allowed is Uniform, Partial, Point or Couple`},
		{"foreign shape", simple, []statics.Load{{Case: "dead", Shape: shaped{}}},
			`loads[0].shape is "statics_test.shaped": allowed is Uniform, Partial, Point or Couple`},
		{"off the right end", simple, one(uniform(1), point(8.1, 5)), "loads[1].at is 8.1 m: allowed is 0 m to 8 m"},
		{"off the left end", simple, one(couple(-0.1, 5)), "loads[0].at is -0.1 m: allowed is 0 m to 8 m"},
		{"place not a number", simple, one(point(nan, 5)), "loads[0].at is NaN m: allowed is 0 m to 8 m"},
		{"strip off the span", simple, one(strip(-1, 9, 1, 1)),
			"loads[0].from is -1 m: allowed is 0 m to 8 m\nloads[0].to is 9 m: allowed is 0 m to 8 m"},
		{"strip turned round", simple, one(strip(3, 2, 1, 1)), "loads[0].to is 2 m: allowed is more than 3 m and at most 8 m"},
		{"strip of no length", simple, one(strip(3, 3, 1, 1)), "loads[0].to is 3 m: allowed is more than 3 m and at most 8 m"},
		{"strip of no length but for rounding", simple, one(strip(3, 3*(1+1e-12), 1, 1)),
			"loads[0].to is 3 m: allowed is more than 3 m and at most 8 m"},
		{"strip off the support by rounding", simple, one(strip(0, 1e-10, 1, 1)),
			"loads[0].to is 0 m: allowed is more than 0 m and at most 8 m"},
		{"intensity not a number", simple, one(uniform(nan)),
			"loads[0].intensity is NaN N/m: allowed is -1000000000000 N/m to 1000000000000 N/m"},
		{"endless intensity", simple, one(strip(0, 8, inf, -inf)),
			"loads[0].intensity is +Inf N/m: allowed is -1000000000000 N/m to 1000000000000 N/m\n" +
				"loads[0].intensity_end is -Inf N/m: allowed is -1000000000000 N/m to 1000000000000 N/m"},
		{"huge force", simple, one(point(3, 1e300)), "loads[0].force is 1e303 N: allowed is -1000000000000 N to 1000000000000 N"},
		{"endless couple", simple, one(couple(3, inf)), "loads[0].moment is +Inf N-m: allowed is -1000000000000 N-m to 1000000000000 N-m"},
		{"several at once", oneSpan(statics.Free, -1, 0), nil,
			"spans[0].length is -1 m: allowed is 0.001 m to 100000 m\n" +
				`supports[1].kind is "SupportKind(0)": allowed is pinned, roller, fixed or free`},
	} {
		t.Run(tc.name, func(t *testing.T) {
			r, err := statics.Analyze(tc.beam, tc.loads)
			require.Nil(t, r)
			require.EqualError(t, err, tc.want)
			var joined interface{ Unwrap() []error }
			require.ErrorAs(t, err, &joined)
			require.Len(t, joined.Unwrap(), strings.Count(tc.want, "\n")+1)
			for _, e := range joined.Unwrap() {
				var outside *statics.RangeError
				var field *statics.FieldError
				require.True(t, errors.As(e, &outside) || errors.As(e, &field), "%T", e)
			}
		})
	}
}

func TestTooManyPieces(t *testing.T) {
	var loads []statics.Load
	for i := range statics.MaxLoads {
		loads = append(loads, statics.Load{Case: fmt.Sprint(i % 200), Shape: point(8*float64(i+1)/(statics.MaxLoads+1), 1)})
	}
	_, err := statics.Analyze(oneSpan(statics.Pinned, 8, statics.Roller), loads)
	require.EqualError(t, err, "pieces of 200 lines is 2000200: allowed is 1 to 1000000")
}

func TestBadCombinations(t *testing.T) {
	r, err := statics.Analyze(oneSpan(statics.Pinned, 8, statics.Roller), []statics.Load{
		{Case: "dead", Shape: uniform(1)}, {Case: "live", Shape: uniform(1)},
	})
	require.NoError(t, err)
	for _, tc := range []struct {
		name         string
		combinations []statics.Combination
		want         string
	}{
		{"none", nil, "combinations is 0: allowed is 1 to 1000000"},
		{"no id", []statics.Combination{{Factors: factors("dead", 1.0)}}, `combinations[0].id is "": allowed is an id of its own`},
		{"same id", []statics.Combination{{ID: "a"}, {ID: "a"}}, `combinations[1].id is "a": allowed is an id of its own`},
		{"unknown case", []statics.Combination{{ID: "a", Factors: factors("dead", 1.0, "snow", 1.0)}},
			`combinations[0].factors[1].case is "snow": allowed is dead, live`},
		{"case twice", []statics.Combination{{ID: "a", Factors: factors("dead", 1.0, "dead", 1.0)}},
			`combinations[0].factors[1].case is "dead": allowed is each case once`},
		{"factor not a number", []statics.Combination{{ID: "a", Factors: factors("dead", math.NaN())}},
			"combinations[0].factors[0].value is NaN: allowed is -1000000 to 1000000"},
		{"endless factor", []statics.Combination{{ID: "a", Factors: factors("dead", math.Inf(-1))}},
			"combinations[0].factors[0].value is -Inf: allowed is -1000000 to 1000000"},
	} {
		t.Run(tc.name, func(t *testing.T) {
			c, err := r.Combine(tc.combinations)
			require.Nil(t, c)
			require.EqualError(t, err, tc.want)
		})
	}

	// Sums of sums are stopped before they leave the range of a float64.
	for range 100 {
		var next *statics.Response
		next, err = r.Combine([]statics.Combination{{ID: "dead", Factors: factors("dead", 1e6)}})
		if err != nil {
			break
		}
		r = next
	}
	require.EqualError(t, err, `combinations[0] is "dead": allowed is factors that keep the forces below 1e33 N-m`)
}

func TestBadQuestions(t *testing.T) {
	r, err := statics.Analyze(oneSpan(statics.Pinned, 8, statics.Roller), one(uniform(1)))
	require.NoError(t, err)
	_, err = r.Lines(0)
	require.EqualError(t, err, "span is 0: allowed is 1")
	_, err = r.Lines(2)
	require.EqualError(t, err, "span is 2: allowed is 1")
	_, err = r.Reactions("snow")
	require.EqualError(t, err, `id is "snow": allowed is only`)
	_, err = r.ReactionExtremes(3)
	require.EqualError(t, err, "support is 3: allowed is 1 to 2")
	lines, err := r.Lines(1)
	require.NoError(t, err)
	_, err = lines.Line("snow")
	require.EqualError(t, err, `id is "snow": allowed is only`)
	_, err = lines.Extremes(m(-1), m(8))
	require.EqualError(t, err, "from is -1 m: allowed is 0 m to 8 m")
	_, err = lines.Extremes(m(5), m(3))
	require.EqualError(t, err, "to is 3 m: allowed is 5 m to 8 m")
	line, err := lines.Line("only")
	require.NoError(t, err)
	_, err = line.Extremes(m(0), m(9))
	require.EqualError(t, err, "to is 9 m: allowed is 0 m to 8 m")
	_, _, err = line.At(m(math.NaN()))
	require.EqualError(t, err, "at is NaN m: allowed is 0 m to 8 m")
	left, right, err := line.At(m(8 * (1 + 1e-12)))
	require.NoError(t, err)
	require.Equal(t, m(8), left.At)
	require.Equal(t, left, right)
}

// TestZeroValues asks the zero values of the result types: they hold nothing,
// and say so.
func TestZeroValues(t *testing.T) {
	var r statics.Response
	for range r.IDs() {
		t.Fatal("an empty response has an id")
	}
	_, err := r.Lines(1)
	require.Error(t, err)
	_, err = r.Reactions("dead")
	require.Error(t, err)
	_, err = r.ReactionExtremes(1)
	require.Error(t, err)
	_, err = r.Combine([]statics.Combination{{ID: "none"}})
	require.Error(t, err)

	var lines statics.Lines
	_, err = lines.Line("dead")
	require.Error(t, err)
	_, err = lines.Extremes(m(0), m(0))
	require.Error(t, err)
	require.Zero(t, lines.Length())
	require.Empty(t, lines.AppendBreaks(nil))

	var line statics.Line
	_, _, err = line.At(m(0))
	require.Error(t, err)
	_, err = line.Extremes(m(0), m(0))
	require.Error(t, err)
	require.Empty(t, line.AppendInflections(nil))
	require.Empty(t, line.AppendZeroShears(nil))
	for range line.Pieces() {
		t.Fatal("an empty line has a piece")
	}
}
