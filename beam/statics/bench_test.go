package statics_test

import (
	"fmt"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/statics"
	"soffit.example/units"
)

// typical is the statics of one beam's design: a few loads in four cases and
// twenty combinations.
func typical() (statics.Beam, []statics.Load, []statics.Combination) {
	loads := []statics.Load{
		{Case: "dead", Shape: uniform(15)},
		{Case: "dead", Shape: point(3, 40)},
		{Case: "live", Shape: uniform(20)},
		{Case: "live", Shape: point(3, 60)},
		{Case: "snow", Shape: strip(2, 6, 0, 8)},
		{Case: "wind", Shape: uniform(-9)},
	}
	var combinations []statics.Combination
	for i := range 20 {
		combinations = append(combinations, statics.Combination{ID: fmt.Sprint(i), Factors: []statics.Factor{
			{Case: "dead", Value: 1.2}, {Case: "live", Value: 1.6 - 0.05*float64(i)},
			{Case: "snow", Value: 0.05 * float64(i)}, {Case: "wind", Value: 0.1 * float64(i)},
		}})
	}
	return oneSpan(statics.Pinned, 8, statics.Roller), loads, combinations
}

// design asks what a design asks of one beam.
func design(t require.TestingT, beam statics.Beam, loads []statics.Load, combinations []statics.Combination) {
	r, err := statics.Analyze(beam, loads)
	require.NoError(t, err)
	c, err := r.Combine(combinations)
	require.NoError(t, err)
	lines, err := c.Lines(1)
	require.NoError(t, err)
	for i := range 10 { // regions and stirrup zones
		_, err := lines.Extremes(m(0.8*float64(i)), m(0.8*float64(i+1)))
		require.NoError(t, err)
	}
	var inflections [8]units.Length
	for _, line := range lines.All() {
		line.AppendInflections(inflections[:0])
		for i := range 5 { // sections of a detailed shear strength
			_, _, err := line.At(m(0.5 + float64(i)))
			require.NoError(t, err)
		}
	}
}

func BenchmarkDesign(b *testing.B) {
	beam, loads, combinations := typical()
	b.ReportAllocs()
	for b.Loop() {
		design(b, beam, loads, combinations)
	}
}

func BenchmarkAnalyze(b *testing.B) {
	beam, loads, _ := typical()
	b.ReportAllocs()
	for b.Loop() {
		_, _ = statics.Analyze(beam, loads)
	}
}

func BenchmarkCombine(b *testing.B) {
	beam, loads, combinations := typical()
	r, err := statics.Analyze(beam, loads)
	require.NoError(b, err)
	b.ReportAllocs()
	for b.Loop() {
		_, _ = r.Combine(combinations)
	}
}

func BenchmarkExtremes(b *testing.B) {
	beam, loads, combinations := typical()
	lines := linesOf(b, beam, loads, combinations)
	b.ReportAllocs()
	for b.Loop() {
		_, _ = lines.Extremes(m(0), m(8))
	}
}

func BenchmarkAt(b *testing.B) {
	beam, loads, combinations := typical()
	line, err := linesOf(b, beam, loads, combinations).Line("7")
	require.NoError(b, err)
	b.ReportAllocs()
	for b.Loop() {
		_, _, _ = line.At(m(2.5))
	}
}

func BenchmarkInflections(b *testing.B) {
	s := solve(b, oneSpan(statics.Fixed, 8, statics.Fixed), one(uniform(10), strip(2, 7, 3, 9), point(3, 40)))
	roots := make([]units.Length, 0, 8)
	b.ReportAllocs()
	for b.Loop() {
		roots = s.line.AppendInflections(roots[:0])
	}
}

// BenchmarkMaxLoads is the largest input that is taken.
func BenchmarkMaxLoads(b *testing.B) {
	loads := make([]statics.Load, statics.MaxLoads)
	for i := range loads {
		x := 50 * float64(i) / statics.MaxLoads
		loads[i] = statics.Load{Case: "only", Shape: strip(x, 100-x, 1, 2)}
	}
	beam := oneSpan(statics.Fixed, 100, statics.Fixed)
	for b.Loop() {
		_, err := statics.Analyze(beam, loads)
		require.NoError(b, err)
	}
}

func linesOf(t require.TestingT, beam statics.Beam, loads []statics.Load, combinations []statics.Combination) *statics.Lines {
	r, err := statics.Analyze(beam, loads)
	require.NoError(t, err)
	c, err := r.Combine(combinations)
	require.NoError(t, err)
	lines, err := c.Lines(1)
	require.NoError(t, err)
	return lines
}

func TestAllocations(t *testing.T) {
	beam, loads, combinations := typical()
	lines := linesOf(t, beam, loads, combinations)
	var sum units.Moment
	roots := make([]units.Length, 0, 64)
	require.Zero(t, testing.AllocsPerRun(100, func() {
		for _, line := range lines.All() {
			left, right, _ := line.At(m(3))
			sum = sum.Add(left.Moment).Add(right.Moment)
			roots = line.AppendInflections(roots[:0])
			roots = line.AppendZeroShears(roots)
			for p := range line.Pieces() {
				sum = sum.Add(p.Moment)
			}
		}
	}), "going through the lines")
	require.Zero(t, testing.AllocsPerRun(100, func() {
		e, _ := lines.Extremes(m(0), m(8))
		sum = sum.Add(e.MomentMost.Moment)
	}), "extremes")
	require.Less(t, testing.AllocsPerRun(100, func() { design(t, beam, loads, combinations) }), 60.0, "a whole design")
	require.True(t, sum.IsFinite())
}
