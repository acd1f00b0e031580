package statics_test

import (
	"cmp"
	"math"
	"slices"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/beam/statics"
)

// A sample is a random stable beam of one span with its loads in plain numbers,
// so that a test can sum them on its own.
type sample struct {
	left, right statics.SupportKind
	length      float64
	loads       []sampleLoad
}

type sampleLoad struct {
	from, to float64 // a strip if to > from
	w, wEnd  float64 // kN/m
	force    float64 // kN
	couple   float64 // kN-m
}

func (s sample) beam() statics.Beam { return oneSpan(s.left, s.length, s.right) }

func (s sample) statics() []statics.Load {
	var shapes []statics.Shape
	for _, l := range s.loads {
		shapes = append(shapes, l.shape(s.length))
	}
	return one(shapes...)
}

func (l sampleLoad) shape(length float64) statics.Shape {
	switch {
	case l.from == 0 && l.to == length && l.w == l.wEnd:
		return uniform(l.w)
	case l.to > l.from:
		return strip(l.from, l.to, l.w, l.wEnd)
	case l.couple != 0:
		return couple(l.from, l.couple)
	}
	return point(l.from, l.force)
}

// resultant is the load's force, its moment about the left end, and a bound on
// its size.
func (l sampleLoad) resultant() (force, moment, size float64) {
	h := l.to - l.from
	rect, tri := l.w*h, (l.wEnd-l.w)*h/2
	force = l.force + rect + tri
	moment = l.force*l.from + l.couple + rect*(l.from+h/2) + tri*(l.from+2*h/3)
	return force, moment, math.Abs(l.force) + math.Abs(l.couple) + math.Abs(rect) + 2*math.Abs(tri)
}

// size is what the beam's errors are measured against, in kN.
func (s sample) size() float64 {
	sum := 0.0
	for _, l := range s.loads {
		_, _, size := l.resultant()
		sum += size
	}
	return sum
}

// stable are the supports that hold one span.
var stable = [][2]statics.SupportKind{
	{statics.Pinned, statics.Roller}, {statics.Roller, statics.Roller}, {statics.Pinned, statics.Pinned},
	{statics.Fixed, statics.Fixed}, {statics.Fixed, statics.Roller}, {statics.Pinned, statics.Fixed},
	{statics.Fixed, statics.Free}, {statics.Free, statics.Fixed},
}

func samples() *rapid.Generator[sample] {
	return rapid.Custom(func(t *rapid.T) sample {
		ends := rapid.SampledFrom(stable).Draw(t, "supports")
		s := sample{left: ends[0], right: ends[1], length: rapid.Float64Range(0.5, 40).Draw(t, "length")}
		// Loads meet often: places are drawn from few as well as from all.
		place := rapid.OneOf(
			rapid.Map(rapid.IntRange(0, 8), func(i int) float64 { return s.length * float64(i) / 8 }),
			rapid.Float64Range(0.001*s.length, 0.999*s.length),
		)
		value := rapid.OneOf(rapid.Float64Range(-100, 100), rapid.Just(0.0), rapid.Just(10.0))
		s.loads = rapid.SliceOfN(rapid.Custom(func(t *rapid.T) sampleLoad {
			switch rapid.IntRange(0, 3).Draw(t, "shape") {
			case 0:
				w := value.Draw(t, "w")
				return sampleLoad{to: s.length, w: w, wEnd: w}
			case 1:
				a, b := place.Draw(t, "from"), place.Draw(t, "to")
				if a > b {
					a, b = b, a
				}
				if b-a < 1e-6*s.length {
					a, b = 0, s.length
				}
				return sampleLoad{from: a, to: b, w: value.Draw(t, "w"), wEnd: value.Draw(t, "wEnd")}
			case 2:
				a := place.Draw(t, "at")
				return sampleLoad{from: a, to: a, force: value.Draw(t, "force")}
			}
			a := place.Draw(t, "at")
			return sampleLoad{from: a, to: a, couple: value.Draw(t, "couple")}
		}), 1, 8).Draw(t, "loads")
		return s
	})
}

// TestEquilibrium sums forces and moments over the whole beam, about both ends,
// and of every part of it left of a cut.
func TestEquilibrium(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s := samples().Draw(t, "beam")
		r := solve(t, s.beam(), s.statics())
		tol := 1e-12 * (s.size() + 1e-9)
		rA, rB := inKN(r.reactions[0].Force), inKN(r.reactions[1].Force)
		cA, cB := inKNm(r.reactions[0].Moment), inKNm(r.reactions[1].Moment)
		var force, moment float64
		for _, l := range s.loads {
			f, m, _ := l.resultant()
			force += f
			moment += m
		}
		require.InDelta(t, force, rA+rB, tol, "sum of forces")
		require.InDelta(t, 0, moment+cA+cB-rB*s.length, tol*(1+s.length), "sum of moments about the left end")
		require.InDelta(t, 0, moment-force*s.length+cA+cB+rA*s.length, tol*(1+s.length), "sum of moments about the right end")

		x := rapid.Float64Range(0, s.length).Draw(t, "cut")
		v, m := rA, cA+rA*x
		for _, l := range s.loads {
			part := l
			switch {
			case l.from >= x:
				continue // at the cut itself the left side is asked for
			case l.to > x:
				part.to = x
				part.wEnd = l.w + (l.wEnd-l.w)*(x-l.from)/(l.to-l.from)
			}
			f, about, _ := part.resultant()
			v -= f
			m -= f*x - about
		}
		left, _ := r.at(t, x)
		if x == 0 {
			return // the value just inside is given there
		}
		require.InDelta(t, v, inKN(left.Shear), tol, "shear at the cut")
		require.InDelta(t, m, inKNm(left.Moment), tol*(1+s.length), "moment at the cut")
	})
}

// TestPieces holds the pieces to dV/dx = -w and dM/dx = V, to the values of At,
// and to each other: jumps only where a point load or a couple acts.
func TestPieces(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s := samples().Draw(t, "beam")
		r := solve(t, s.beam(), s.statics())
		tol := 1e-12 * (s.size() + 1e-9) * (1 + s.length)
		jump := func(x float64) (force, couple float64) {
			for _, l := range s.loads {
				if l.from == x && l.to == x {
					force += l.force
					couple += l.couple
				}
			}
			return force, couple
		}
		v, m := inKN(r.reactions[0].Force), inKNm(r.reactions[0].Moment)
		end := 0.0
		for p := range r.line.Pieces() {
			x := inM(p.From)
			require.InDelta(t, end, x, 1e-12*s.length)
			end = inM(p.To)
			h := end - x
			force, couple := jump(x)
			require.InDelta(t, v-force, inKN(p.Shear), tol, "shear where a piece begins")
			require.InDelta(t, m+couple, inKNm(p.Moment), tol, "moment where a piece begins")
			w := p.Intensity.In(perMetre)
			slope := (p.IntensityEnd.In(perMetre) - w) / h
			shear := func(x float64) float64 { return inKN(p.Shear) - w*x - slope*x*x/2 }
			moment := func(x float64) float64 { return inKNm(p.Moment) + inKN(p.Shear)*x - w*x*x/2 - slope*x*x*x/6 }
			v, m = inKN(p.ShearEnd), inKNm(p.MomentEnd)
			require.InDelta(t, shear(h), v, tol)
			require.InDelta(t, moment(h), m, tol)

			// Central differences are exact for a quadratic, and for a cubic but
			// for its third derivative, which is known.
			if h < 1e-3*s.length {
				continue
			}
			mid, d := h/2, h/8
			at := func(t0 float64) (v, m float64) {
				f, _ := r.at(t, x+t0)
				return inKN(f.Shear), inKNm(f.Moment)
			}
			v0, m0 := at(mid)
			v1, m1 := at(mid - d)
			v2, m2 := at(mid + d)
			require.InDelta(t, moment(mid), m0, tol)
			require.InDelta(t, -(w + slope*mid), (v2-v1)/(2*d), tol*10/d, "dV/dx")
			require.InDelta(t, v0, (m2-m1)/(2*d)+slope*d*d/6, tol*10/d, "dM/dx")
		}
		require.Equal(t, s.length, end)
		force, couple := jump(s.length)
		require.InDelta(t, -inKN(r.reactions[1].Force), v-force, tol)
		require.InDelta(t, -inKNm(r.reactions[1].Moment), m+couple, tol)
	})
}

// TestExtremesHold samples densely: no value exceeds the extremes, and each
// extreme is the value at its own place and side.
func TestExtremesHold(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s := samples().Draw(t, "beam")
		r := solve(t, s.beam(), s.statics())
		from := rapid.Float64Range(0, s.length).Draw(t, "from")
		to := rapid.Float64Range(from, s.length).Draw(t, "to")
		e, err := r.line.Extremes(m(from), m(to))
		require.NoError(t, err)
		vTol := 1e-11 * (s.size() + 1e-9)
		mTol := vTol * (1 + s.length)
		const n = 200
		for i := range n + 1 {
			x := min(from+(to-from)*float64(i)/n, to)
			left, right := r.at(t, x)
			for _, f := range []statics.Forces{left, right} {
				require.LessOrEqual(t, inKNm(f.Moment), inKNm(e.MomentMost.Moment)+mTol)
				require.GreaterOrEqual(t, inKNm(f.Moment), inKNm(e.MomentLeast.Moment)-mTol)
				require.LessOrEqual(t, inKN(f.Shear), inKN(e.ShearMost.Shear)+vTol)
				require.GreaterOrEqual(t, inKN(f.Shear), inKN(e.ShearLeast.Shear)-vTol)
			}
		}
		for _, f := range []statics.Forces{e.MomentMost, e.MomentLeast, e.ShearMost, e.ShearLeast} {
			require.LessOrEqual(t, from, inM(f.At))
			require.LessOrEqual(t, inM(f.At), to)
			left, right := r.at(t, inM(f.At))
			there := left
			if f.Side == statics.Right {
				there = right
			}
			require.Equal(t, there.Side, f.Side)
			require.InDelta(t, inKNm(there.Moment), inKNm(f.Moment), mTol)
			require.InDelta(t, inKN(there.Shear), inKN(f.Shear), vTol)
		}
	})
}

// TestRoots checks that shear and moment change sign where they are said to,
// and keep it in between.
func TestRoots(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s := samples().Draw(t, "beam")
		r := solve(t, s.beam(), s.statics())
		vTol := 1e-11 * (s.size() + 1e-9)
		mTol := vTol * (1 + s.length)
		check := func(roots []float64, tol float64, value func(statics.Forces) float64) {
			require.True(t, slices.IsSorted(roots))
			bounds := append(append([]float64{0}, roots...), s.length)
			sign := 0.0
			for i := 1; i < len(bounds); i++ {
				var here float64
				for k := range 41 {
					x := bounds[i-1] + (bounds[i]-bounds[i-1])*(float64(k)+0.5)/41
					left, _ := r.at(t, min(x, s.length))
					v := value(left)
					if math.Abs(v) <= tol {
						continue
					}
					require.GreaterOrEqual(t, v*here, 0.0, "one sign between roots")
					here = v
				}
				require.LessOrEqual(t, here*sign, 0.0, "the sign changes at a root")
				if here != 0 {
					sign = here
				}
			}
			for _, x := range roots {
				left, right := r.at(t, x)
				lo, hi := value(left), value(right)
				if lo > hi {
					lo, hi = hi, lo
				}
				require.LessOrEqual(t, lo, tol, "zero lies between the sides of a root")
				require.GreaterOrEqual(t, hi, -tol, "zero lies between the sides of a root")
			}
		}
		check(metres(r.line.AppendInflections(nil)), mTol, func(f statics.Forces) float64 { return inKNm(f.Moment) })
		check(metres(r.line.AppendZeroShears(nil)), vTol, func(f statics.Forces) float64 { return inKN(f.Shear) })
	})
}

// TestMirror turns the beam round: shears change sign, moments do not.
func TestMirror(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s := samples().Draw(t, "beam")
		mirror := sample{left: s.right, right: s.left, length: s.length}
		for _, l := range s.loads {
			mirror.loads = append(mirror.loads, sampleLoad{
				from: s.length - l.to, to: s.length - l.from, w: l.wEnd, wEnd: l.w, force: l.force, couple: -l.couple,
			})
		}
		a, b := solve(t, s.beam(), s.statics()), solve(t, mirror.beam(), mirror.statics())
		tol := 1e-11 * (s.size() + 1e-9) * (1 + s.length)
		require.InDelta(t, inKN(a.reactions[0].Force), inKN(b.reactions[1].Force), tol)
		require.InDelta(t, inKN(a.reactions[1].Force), inKN(b.reactions[0].Force), tol)
		require.InDelta(t, inKNm(a.reactions[0].Moment), -inKNm(b.reactions[1].Moment), tol)
		ea, eb := a.extremes(t), b.extremes(t)
		require.InDelta(t, inKNm(ea.MomentMost.Moment), inKNm(eb.MomentMost.Moment), tol)
		require.InDelta(t, inKNm(ea.MomentLeast.Moment), inKNm(eb.MomentLeast.Moment), tol)
		require.InDelta(t, inKN(ea.ShearMost.Shear), -inKN(eb.ShearLeast.Shear), tol)
	})
}

// TestSuperposition compares a combination of cases with one case that holds
// all their loads factored, everywhere and at the supports.
func TestSuperposition(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s := samples().Draw(t, "beam")
		cases := []string{"dead", "live", "wind"}
		factors := map[string]float64{}
		c := statics.Combination{ID: "sum"}
		for _, id := range cases {
			factors[id] = rapid.Float64Range(-2, 2).Draw(t, id)
		}
		var loads []statics.Load
		factored := s
		factored.loads = nil
		used := map[string]bool{}
		for i, l := range s.loads {
			id := cases[i%len(cases)]
			if !used[id] {
				c.Factors = append(c.Factors, statics.Factor{Case: id, Value: factors[id]})
			}
			used[id] = true
			loads = append(loads, statics.Load{Case: id, Span: 1, Shape: l.shape(s.length)})
			f := factors[id]
			factored.loads = append(factored.loads, sampleLoad{l.from, l.to, f * l.w, f * l.wEnd, f * l.force, f * l.couple})
		}
		r, err := statics.Analyze(s.beam(), loads)
		require.NoError(t, err)
		sum, err := r.Combine([]statics.Combination{c})
		require.NoError(t, err)
		lines, err := sum.Lines(1)
		require.NoError(t, err)
		line, err := lines.Line("sum")
		require.NoError(t, err)
		whole := solve(t, s.beam(), factored.statics())
		tol := 1e-11 * (s.size() + 1e-9) * (1 + s.length)
		for i := range 33 {
			x := s.length * float64(i) / 32
			left, right, err := line.At(m(x))
			require.NoError(t, err)
			l, r := whole.at(t, x)
			require.InDelta(t, inKNm(l.Moment), inKNm(left.Moment), tol)
			require.InDelta(t, inKNm(r.Moment), inKNm(right.Moment), tol)
			require.InDelta(t, inKN(l.Shear), inKN(left.Shear), tol)
			require.InDelta(t, inKN(r.Shear), inKN(right.Shear), tol)
		}
		reactions, err := sum.Reactions("sum")
		require.NoError(t, err)
		for i, want := range whole.reactions {
			require.InDelta(t, inKN(want.Force), inKN(reactions[i].Force), tol)
			require.InDelta(t, inKNm(want.Moment), inKNm(reactions[i].Moment), tol)
		}
	})
}

// TestOrder checks that the order of the loads of a case does not matter.
func TestOrder(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s := samples().Draw(t, "beam")
		a := solve(t, s.beam(), s.statics())
		slices.SortFunc(s.loads, func(x, y sampleLoad) int { return cmp.Compare(y.from, x.from) })
		b := solve(t, s.beam(), s.statics())
		tol := 1e-12 * (s.size() + 1e-9) * (1 + s.length)
		require.InDelta(t, inKNm(a.extremes(t).MomentMost.Moment), inKNm(b.extremes(t).MomentMost.Moment), tol)
		require.InDelta(t, inKN(a.reactions[0].Force), inKN(b.reactions[0].Force), tol)
	})
}

// TestMostLoads gathers the rounding of as many loads as are taken: it stays
// within what the package counts as equal.
func TestMostLoads(t *testing.T) {
	for _, ends := range stable {
		s := sample{left: ends[0], right: ends[1], length: 30}
		for i := range statics.MaxLoads {
			// A golden-ratio sequence spreads the loads without order.
			_, x := math.Modf(float64(i) * math.Phi)
			x *= s.length
			switch i % 3 {
			case 0:
				s.loads = append(s.loads, sampleLoad{from: x, to: x, force: 10 * math.Sin(float64(i))})
			case 1:
				s.loads = append(s.loads, sampleLoad{from: x, to: x, couple: 10 * math.Cos(float64(i))})
			default:
				s.loads = append(s.loads, sampleLoad{from: x, to: min(x+0.5, s.length), w: 5, wEnd: 7 * math.Sin(float64(i))})
			}
		}
		r := solve(t, s.beam(), s.statics())
		var last statics.Piece
		for p := range r.line.Pieces() {
			last = p
		}
		h := inM(last.To) - inM(last.From)
		w, wEnd := last.Intensity.In(perMetre), last.IntensityEnd.In(perMetre)
		tol := 1e-13 * s.size()
		require.InDelta(t, inKN(last.ShearEnd), inKN(last.Shear)-(w+wEnd)/2*h, tol)
		require.InDelta(t, inKNm(last.MomentEnd),
			inKNm(last.Moment)+inKN(last.Shear)*h-(2*w+wEnd)/6*h*h, tol*s.length)
	}
}
