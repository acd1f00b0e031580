package statics_test

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/statics"
	"soffit.example/units"
)

// The tests count in kN and m.

func m(v float64) units.Length      { return units.Metre.Of(v) }
func kN(v float64) units.Force      { return units.Kilonewton.Of(v) }
func kNm(v float64) units.Moment    { return units.KilonewtonMetre.Of(v) }
func perM(v float64) units.LineLoad { return units.KilonewtonPerMetre.Of(v) }

const perMetre = units.KilonewtonPerMetre

func inM(l units.Length) float64   { return l.In(units.Metre) }
func inKN(f units.Force) float64   { return f.In(units.Kilonewton) }
func inKNm(v units.Moment) float64 { return v.In(units.KilonewtonMetre) }

// oneSpan is a beam of one span.
func oneSpan(left statics.SupportKind, length float64, right statics.SupportKind) statics.Beam {
	return statics.Beam{
		Spans:    []statics.Span{{Length: m(length)}},
		Supports: []statics.Support{{Kind: left}, {Kind: right}},
	}
}

// one makes loads of one case of the given shapes.
func one(shapes ...statics.Shape) []statics.Load {
	loads := make([]statics.Load, len(shapes))
	for i, s := range shapes {
		loads[i] = statics.Load{Case: "only", Shape: s}
	}
	return loads
}

func uniform(w float64) statics.Shape { return statics.Uniform{Intensity: perM(w)} }

func strip(from, to, w, wEnd float64) statics.Shape {
	return statics.Partial{From: m(from), To: m(to), Intensity: perM(w), IntensityEnd: perM(wEnd)}
}

func point(at, force float64) statics.Shape {
	return statics.Point{Force: kN(force), At: m(at)}
}

func couple(at, moment float64) statics.Shape {
	return statics.Couple{Moment: kNm(moment), At: m(at)}
}

// solved is a one-span beam under the loads of one case.
type solved struct {
	line      *statics.Line
	reactions []statics.Reaction
	length    units.Length
}

func solve(t require.TestingT, b statics.Beam, loads []statics.Load) solved {
	r, err := statics.Analyze(b, loads)
	require.NoError(t, err)
	lines, err := r.Lines(1)
	require.NoError(t, err)
	line, err := lines.Line("only")
	require.NoError(t, err)
	reactions, err := r.Reactions("only")
	require.NoError(t, err)
	return solved{line, reactions, b.Spans[0].Length}
}

func (s solved) extremes(t require.TestingT) statics.Extremes {
	e, err := s.line.Extremes(m(0), s.length)
	require.NoError(t, err)
	return e
}

// at returns the forces on both sides of x.
func (s solved) at(t require.TestingT, x float64) (left, right statics.Forces) {
	left, right, err := s.line.At(m(x))
	require.NoError(t, err)
	return left, right
}

func metres(places []units.Length) []float64 {
	out := make([]float64, len(places))
	for i, p := range places {
		out[i] = inM(p)
	}
	return out
}

func TestNames(t *testing.T) {
	require.Equal(t, []string{"pinned", "roller", "fixed", "free", "SupportKind(0)"}, []string{
		statics.Pinned.String(), statics.Roller.String(), statics.Fixed.String(), statics.Free.String(),
		statics.SupportKind(0).String(),
	})
	require.Equal(t, []string{"both", "left", "right"}, []string{
		statics.Both.String(), statics.Left.String(), statics.Right.String(),
	})
}
