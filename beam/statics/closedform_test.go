package statics_test

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/statics"
)

// want holds the closed form of a beam diagram, in kN and m. Reaction moments
// are given as bending moments at the support.
type want struct {
	rA, rB, mA, mB         float64
	most, mostAt           float64 // greatest moment
	least, leastAt         float64
	inflections, zeroShear []float64
}

// TestBeamDiagrams holds the analysis against the closed forms of the AISC Steel
// Construction Manual, Table 3-23 ("Shears, Moments and Deflections"; formulas
// from memory, case numbers as in the 13th to 15th editions), and of Roark's
// Formulas for Stress and Strain, Table 8.1 (7th edition; from memory). Sagging
// is positive here, and couples clockwise, where Roark's are anticlockwise.
func TestBeamDiagrams(t *testing.T) {
	const (
		l = 8.0
		w = 12.0
		p = 35.0
		c = 40.0
		a = 3.0
		b = l - a
	)
	const total = w * l / 2 // of a triangle with peak w
	pinned, roller, fixed, free := statics.Pinned, statics.Roller, statics.Fixed, statics.Free
	sqrt := math.Sqrt
	viete := func(k float64) float64 {
		return 2 * sqrt(0.3) * math.Cos((math.Acos(-0.1/(0.3*sqrt(0.3)))+k*math.Pi)/3)
	}

	cases := []struct {
		name        string
		left, right statics.SupportKind
		loads       []statics.Shape
		want        want
	}{
		{"AISC 1: simple, uniform", pinned, roller, []statics.Shape{uniform(w)},
			want{rA: w * l / 2, rB: w * l / 2, most: w * l * l / 8, mostAt: l / 2, zeroShear: []float64{l / 2}}},
		{"AISC 1 on two rollers", roller, roller, []statics.Shape{uniform(w)},
			want{rA: w * l / 2, rB: w * l / 2, most: w * l * l / 8, mostAt: l / 2, zeroShear: []float64{l / 2}}},
		{"AISC 2: simple, growing to the right", pinned, roller, []statics.Shape{strip(0, l, 0, w)},
			want{rA: total / 3, rB: 2 * total / 3, most: 2 * total * l / (9 * sqrt(3)), mostAt: l / sqrt(3),
				zeroShear: []float64{l / sqrt(3)}}},
		{"AISC 3: simple, growing to the middle", pinned, roller, []statics.Shape{strip(0, l/2, 0, w), strip(l/2, l, w, 0)},
			want{rA: total / 2, rB: total / 2, most: total * l / 6, mostAt: l / 2, zeroShear: []float64{l / 2}}},
		{"AISC 4: simple, uniform over the middle part", pinned, roller, []statics.Shape{strip(1, 5, w, w)},
			func() want {
				const a, b, c = 1.0, 4.0, 3.0
				r1, r2 := w*b/(2*l)*(2*c+b), w*b/(2*l)*(2*a+b)
				return want{rA: r1, rB: r2, most: r1 * (a + r1/(2*w)), mostAt: a + r1/w, zeroShear: []float64{a + r1/w}}
			}()},
		{"AISC 5: simple, uniform over the left part", pinned, roller, []statics.Shape{strip(0, a, w, w)},
			func() want {
				r1 := w * a / (2 * l) * (2*l - a)
				return want{rA: r1, rB: w * a * a / (2 * l), most: r1 * r1 / (2 * w), mostAt: r1 / w, zeroShear: []float64{r1 / w}}
			}()},
		{"AISC 6: simple, two uniform parts at the ends", pinned, roller, []statics.Shape{strip(0, 2, 20, 20), strip(5, l, w, w)},
			func() want {
				const w1, a, w2, c = 20.0, 2.0, w, 3.0
				r1 := (w1*a*(2*l-a) + w2*c*c) / (2 * l)
				r2 := (w2*c*(2*l-c) + w1*a*a) / (2 * l)
				// R2 < w2 c here, so the greatest moment is R2²/(2 w2).
				return want{rA: r1, rB: r2, most: r2 * r2 / (2 * w2), mostAt: l - r2/w2, zeroShear: []float64{l - r2/w2}}
			}()},
		{"AISC 7: simple, point at the middle", pinned, roller, []statics.Shape{point(l/2, p)},
			want{rA: p / 2, rB: p / 2, most: p * l / 4, mostAt: l / 2, zeroShear: []float64{l / 2}}},
		{"AISC 8: simple, point anywhere", pinned, roller, []statics.Shape{point(a, p)},
			want{rA: p * b / l, rB: p * a / l, most: p * a * b / l, mostAt: a, zeroShear: []float64{a}}},
		{"AISC 9: simple, two equal points placed evenly", pinned, roller, []statics.Shape{point(a, p), point(l-a, p)},
			want{rA: p, rB: p, most: p * a, mostAt: a, zeroShear: []float64{a}}},
		{"AISC 11: simple, two unequal points", pinned, roller, []statics.Shape{point(2, 50), point(5, p)},
			func() want {
				const p1, a, p2, b = 50.0, 2.0, p, 3.0
				r1, r2 := (p1*(l-a)+p2*b)/l, (p1*a+p2*(l-b))/l
				// R1 > P1 here, so the greatest moment is R2 b.
				return want{rA: r1, rB: r2, most: r2 * b, mostAt: l - b, zeroShear: []float64{l - b}}
			}()},
		{"AISC 12: propped, uniform", roller, fixed, []statics.Shape{uniform(w)},
			want{rA: 3 * w * l / 8, rB: 5 * w * l / 8, mB: -w * l * l / 8,
				most: 9 * w * l * l / 128, mostAt: 3 * l / 8, least: -w * l * l / 8, leastAt: l,
				inflections: []float64{3 * l / 4}, zeroShear: []float64{3 * l / 8}}},
		{"AISC 13: propped, point at the middle", roller, fixed, []statics.Shape{point(l/2, p)},
			want{rA: 5 * p / 16, rB: 11 * p / 16, mB: -3 * p * l / 16, most: 5 * p * l / 32, mostAt: l / 2,
				least: -3 * p * l / 16, leastAt: l, inflections: []float64{8 * l / 11}, zeroShear: []float64{l / 2}}},
		{"AISC 14: propped, point anywhere", roller, fixed, []statics.Shape{point(a, p)},
			func() want {
				r1 := p * b * b / (2 * l * l * l) * (a + 2*l)
				m2 := p * a * b / (2 * l * l) * (a + l)
				return want{rA: r1, rB: p - r1, mB: -m2, most: r1 * a, mostAt: a, least: -m2, leastAt: l,
					inflections: []float64{p * a / (p - r1)}, zeroShear: []float64{a}}
			}()},
		{"AISC 15: fixed, uniform", fixed, fixed, []statics.Shape{uniform(w)},
			want{rA: w * l / 2, rB: w * l / 2, mA: -w * l * l / 12, mB: -w * l * l / 12,
				most: w * l * l / 24, mostAt: l / 2, least: -w * l * l / 12, leastAt: 0,
				inflections: []float64{l/2 - l/sqrt(12), l/2 + l/sqrt(12)}, zeroShear: []float64{l / 2}}},
		{"AISC 16: fixed, point at the middle", fixed, fixed, []statics.Shape{point(l/2, p)},
			want{rA: p / 2, rB: p / 2, mA: -p * l / 8, mB: -p * l / 8, most: p * l / 8, mostAt: l / 2,
				least: -p * l / 8, inflections: []float64{l / 4, 3 * l / 4}, zeroShear: []float64{l / 2}}},
		{"AISC 17: fixed, point anywhere", fixed, fixed, []statics.Shape{point(a, p)},
			func() want {
				r1 := p * b * b / (l * l * l) * (3*a + b)
				m1, m2 := p*a*b*b/(l*l), p*a*a*b/(l*l)
				return want{rA: r1, rB: p - r1, mA: -m1, mB: -m2, most: 2 * p * a * a * b * b / (l * l * l), mostAt: a,
					least: -m1, leastAt: 0, inflections: []float64{m1 / r1, l - m2/(p-r1)}, zeroShear: []float64{a}}
			}()},
		{"AISC 18: cantilever, growing to the fixed end", free, fixed, []statics.Shape{strip(0, l, 0, w)},
			want{rB: total, mB: -total * l / 3, least: -total * l / 3, leastAt: l}},
		{"AISC 19: cantilever, uniform", free, fixed, []statics.Shape{uniform(w)},
			want{rB: w * l, mB: -w * l * l / 2, least: -w * l * l / 2, leastAt: l}},
		{"AISC 19 mirrored", fixed, free, []statics.Shape{uniform(w)},
			want{rA: w * l, mA: -w * l * l / 2, least: -w * l * l / 2, leastAt: 0, mostAt: l}},
		{"AISC 21: cantilever, point anywhere", free, fixed, []statics.Shape{point(a, p)},
			want{rB: p, mB: -p * b, least: -p * b, leastAt: l}},
		{"AISC 22: cantilever, point at the free end", free, fixed, []statics.Shape{point(0, p)},
			want{rB: p, mB: -p * l, least: -p * l, leastAt: l}},
		{"AISC 22 mirrored", fixed, free, []statics.Shape{point(l, p)},
			want{rA: p, mA: -p * l, least: -p * l, leastAt: 0, mostAt: l}},
		{"Roark 3a: cantilever, couple", free, fixed, []statics.Shape{couple(a, c)},
			want{mB: c, most: c, mostAt: a}},
		{"Roark 3c: propped, couple", roller, fixed, []statics.Shape{couple(a, c)},
			func() want {
				rA := -3 * c / (2 * l * l * l) * (l*l - a*a)
				return want{rA: rA, rB: -rA, mB: rA*l + c, least: rA * a, leastAt: a, most: rA*a + c, mostAt: a,
					inflections: []float64{a, c / -rA}}
			}()},
		{"Roark 3d: fixed, couple", fixed, fixed, []statics.Shape{couple(a, c)},
			func() want {
				rA := -6 * c * a * (l - a) / (l * l * l)
				mA := -c / (l * l) * (l*l - 4*a*l + 3*a*a)
				// a > l/3, so the left end sags.
				return want{rA: rA, rB: -rA, mA: mA, mB: mA + rA*l + c, least: mA + rA*a, leastAt: a,
					most: mA + rA*a + c, mostAt: a, inflections: []float64{mA / -rA, a, (mA + c) / -rA}}
			}()},
		{"Roark 3e: simple, couple", pinned, roller, []statics.Shape{couple(a, c)},
			want{rA: -c / l, rB: c / l, least: -c * a / l, leastAt: a, most: c * b / l, mostAt: a, inflections: []float64{a}}},
		{"Roark 2d: fixed, growing to the right", fixed, fixed, []statics.Shape{strip(0, l, 0, w)},
			func() want {
				rA := 3 * w * l / 20
				x := sqrt(0.3) * l // V = 0.15 wl - w x²/(2l)
				most := -w*l*l/30 + rA*x - w*x*x*x/(6*l)
				return want{rA: rA, rB: 7 * w * l / 20, mA: -w * l * l / 30, mB: -w * l * l / 20,
					most: most, mostAt: x, least: -w * l * l / 20, leastAt: l, zeroShear: []float64{x},
					// 5x³ - 4.5 xl² + l³ = 0, by Viète's cosines
					inflections: []float64{viete(-2) * l, viete(0) * l}}
			}()},
		{"load on the supports alone", pinned, fixed, []statics.Shape{point(0, p), point(l, 2*p), couple(l, c)},
			want{rA: p, rB: 2 * p, mB: c}},
		{"couple on a pinned end", pinned, roller, []statics.Shape{couple(0, c)},
			want{rA: -c / l, rB: c / l, most: c, mostAt: 0, leastAt: l}},
		{"couple on a far pinned end", pinned, roller, []statics.Shape{couple(l, c)},
			want{rA: -c / l, rB: c / l, least: -c, leastAt: l}},
		{"couple on a free end", fixed, free, []statics.Shape{couple(l, c)},
			want{mA: -c, least: -c, most: -c}},
		{"uplift", pinned, roller, []statics.Shape{uniform(-w)},
			want{rA: -w * l / 2, rB: -w * l / 2, least: -w * l * l / 8, leastAt: l / 2, zeroShear: []float64{l / 2}}},
	}
	for _, tc := range cases {
		t.Run(tc.name, func(t *testing.T) {
			s := solve(t, oneSpan(tc.left, l, tc.right), one(tc.loads...))
			near := func(want, got float64, what string) {
				t.Helper()
				require.InDelta(t, want, got, 1e-11, what)
			}
			near(tc.want.rA, inKN(s.reactions[0].Force), "left reaction")
			near(tc.want.rB, inKN(s.reactions[1].Force), "right reaction")
			near(tc.want.mA, inKNm(s.reactions[0].Moment), "left moment")
			near(-tc.want.mB, inKNm(s.reactions[1].Moment), "right moment, as a couple")
			e := s.extremes(t)
			near(tc.want.most, inKNm(e.MomentMost.Moment), "most moment")
			near(tc.want.mostAt, inM(e.MomentMost.At), "its place")
			near(tc.want.least, inKNm(e.MomentLeast.Moment), "least moment")
			near(tc.want.leastAt, inM(e.MomentLeast.At), "its place")
			requireNear(t, tc.want.inflections, metres(s.line.AppendInflections(nil)), "inflection points")
			requireNear(t, tc.want.zeroShear, metres(s.line.AppendZeroShears(nil)), "zero shears")
		})
	}
}

func requireNear(t *testing.T, want, got []float64, what string) {
	t.Helper()
	require.Len(t, got, len(want), what)
	for i := range want {
		require.InDelta(t, want[i], got[i], 1e-11, "%s %d", what, i)
	}
}
