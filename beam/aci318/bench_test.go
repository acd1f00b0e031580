package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// handFlexure is φMn of a rectangle written out for benchmarks: in., lb and
// psi in plain float64, halving on c, and no case but this one.
func handFlexure(fc, beta1, b, es, yieldStrain, full float64, depth, area, fy []float64) (phi, design float64) {
	balance := func(c float64) float64 {
		a := beta1 * c
		sum := 0.85 * fc * b * a
		for i, d := range depth {
			f := max(-fy[i], min(fy[i], es*0.003*(c-d)/c))
			if d < a {
				f -= 0.85 * fc
			}
			sum += area[i] * f
		}
		return sum
	}
	var extreme float64
	for _, d := range depth {
		extreme = max(extreme, d)
	}
	lo, hi := 0.0, 2*extreme
	for hi-lo > 1e-13*hi {
		mid := (lo + hi) / 2
		if balance(mid) < 0 {
			lo = mid
		} else {
			hi = mid
		}
	}
	c := (lo + hi) / 2
	a := beta1 * c
	moment := -0.85 * fc * b * a * a / 2
	for i, d := range depth {
		f := max(-fy[i], min(fy[i], es*0.003*(c-d)/c))
		if d < a {
			f -= 0.85 * fc
		}
		moment -= area[i] * f * d
	}
	strain := 0.003 * (extreme - c) / c
	switch {
	case strain >= full:
		phi = 0.9
	case strain <= yieldStrain:
		phi = 0.65
	default:
		phi = 0.65 + 0.25*(strain-yieldStrain)/(full-yieldStrain)
	}
	return phi, phi * moment
}

// benchmarkTrial is a doubly reinforced trial with two layers of tension
// steel, and the same for handFlexure.
func benchmarkTrial(t testing.TB) (*beam.Trial, func() (phi, design float64)) {
	relied := top(2, "#8")
	relied.InCompression = true
	second := beam.Row{Mark: "B2", Bar: "#9", Count: 2, Face: beam.Bottom, Layer: 2}
	_, trial := checkUS(t, ACI31819(), []beam.Row{bottom(4, "#9"), second, relied}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(200)})
	trial.Record = false
	var depth, area, fy []float64
	for _, l := range trial.Layers(beam.Positive, us19.steelModulus()) {
		depth, area, fy = append(depth, l.Depth.In(units.Inch)), append(area, l.Area.In(units.SquareInch)), append(fy, 60000)
	}
	return trial, func() (phi, design float64) {
		return handFlexure(4000, 0.85, 14, 29e6, 60.0/29000, 60.0/29000+0.003, depth, area, fy)
	}
}

func TestKernelAgainstHandWritten(t *testing.T) {
	trial, hand := benchmarkTrial(t)
	f, ok := us19.trialFlexure(trial, beam.Positive)
	require.True(t, ok)
	phi, design := hand()
	require.InEpsilon(t, phi, f.phi, 1e-9)
	require.InEpsilon(t, design, f.design.In(units.PoundInch), 1e-9)
	require.Zero(t, testing.AllocsPerRun(100, func() { us19.trialFlexure(trial, beam.Positive) }))
}

func BenchmarkFlexureKernel(b *testing.B) {
	trial, _ := benchmarkTrial(b)
	b.ReportAllocs()
	for b.Loop() {
		us19.trialFlexure(trial, beam.Positive)
	}
}

func BenchmarkFlexureHandWritten(b *testing.B) {
	_, hand := benchmarkTrial(b)
	b.ReportAllocs()
	for b.Loop() {
		hand()
	}
}

func BenchmarkJudgeBending(b *testing.B) {
	trial, _ := benchmarkTrial(b)
	var dst []beam.Check
	b.ReportAllocs()
	for b.Loop() {
		dst = ACI31819().Judge(dst[:0], beam.Bending, trial)
	}
}
