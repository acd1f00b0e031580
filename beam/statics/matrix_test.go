package statics_test

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"
	"gonum.org/v1/gonum/mat"
	"pgregory.net/rapid"

	"soffit.example/beam/statics"
)

// cells is the number of elements of the matrix route; loads stand on nodes.
const cells = 24

// gridSamples are random beams whose loads begin, end and act on nodes.
func gridSamples() *rapid.Generator[sample] {
	return rapid.Custom(func(t *rapid.T) sample {
		ends := rapid.SampledFrom(stable).Draw(t, "supports")
		s := sample{left: ends[0], right: ends[1], length: rapid.Float64Range(1, 30).Draw(t, "length")}
		value := rapid.Float64Range(-100, 100)
		node := func(name string, lo, hi int) float64 {
			i := rapid.IntRange(lo, hi).Draw(t, name)
			return s.length * float64(i) / cells
		}
		for range rapid.IntRange(1, 10).Draw(t, "n") {
			switch rapid.IntRange(0, 2).Draw(t, "shape") {
			case 0:
				i := rapid.IntRange(0, cells-1).Draw(t, "first")
				s.loads = append(s.loads, sampleLoad{
					from: s.length * float64(i) / cells, to: node("to", i+1, cells),
					w: value.Draw(t, "w"), wEnd: value.Draw(t, "wEnd"),
				})
			case 1:
				x := node("at", 0, cells)
				s.loads = append(s.loads, sampleLoad{from: x, to: x, force: value.Draw(t, "force")})
			default:
				x := node("at", 0, cells)
				s.loads = append(s.loads, sampleLoad{from: x, to: x, couple: value.Draw(t, "couple")})
			}
		}
		return s
	})
}

// TestMatrixRoute solves the beam a second time by the displacement method: a
// stiffness matrix of many elements, their loads put on the nodes by the
// clamped-end forces of a trapezoid. It shares nothing with the package. Unknown
// are the deflection (down) and rotation (clockwise) of each node.
func TestMatrixRoute(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s := gridSamples().Draw(t, "beam")
		h := s.length / cells
		const dofs = 2 * (cells + 1)
		k := mat.NewDense(dofs, dofs, nil)
		load := mat.NewVecDense(dofs, nil)
		// The element in units of EI/h³, after dividing rotations by 1/h.
		stiffness := [4][4]float64{{12, 6, -12, 6}, {6, 4, -6, 2}, {-12, -6, 12, -6}, {6, 2, -6, 4}}
		// clamped[i] is what element i, clamped, puts on its nodes: force down, couple/h clockwise.
		var clamped [cells][4]float64
		largest := 0.0
		for i := range cells {
			for r := range 4 {
				for c := range 4 {
					k.Set(2*i+r, 2*i+c, k.At(2*i+r, 2*i+c)+stiffness[r][c])
				}
			}
			x := h * (float64(i) + 0.5)
			for _, l := range s.loads {
				if !(l.from < x && x < l.to) {
					continue
				}
				slope := (l.wEnd - l.w) / (l.to - l.from)
				w1, w2 := l.w+slope*(x-h/2-l.from), l.w+slope*(x+h/2-l.from)
				for r, f := range [4]float64{
					(7*w1 + 3*w2) * h / 20, (3*w1 + 2*w2) * h / 60, (3*w1 + 7*w2) * h / 20, -(2*w1 + 3*w2) * h / 60,
				} {
					clamped[i][r] += f
				}
			}
			for r, f := range clamped[i] {
				load.SetVec(2*i+r, load.AtVec(2*i+r)+f)
				largest = max(largest, math.Abs(f))
			}
		}
		var jumps [cells + 1][2]float64
		for _, l := range s.loads {
			if l.to == l.from {
				i := int(math.Round(l.from / h))
				jumps[i][0] += l.force
				jumps[i][1] += l.couple / h
				largest = max(largest, math.Abs(l.force), math.Abs(l.couple)/h)
			}
		}
		for i, j := range jumps {
			load.SetVec(2*i, load.AtVec(2*i)+j[0])
			load.SetVec(2*i+1, load.AtVec(2*i+1)+j[1])
		}
		hold := func(dof int) {
			for c := range dofs {
				k.Set(dof, c, 0)
			}
			k.Set(dof, dof, 1)
			load.SetVec(dof, 0)
		}
		for end, kind := range map[int]statics.SupportKind{0: s.left, cells: s.right} {
			if kind != statics.Free {
				hold(2 * end)
			}
			if kind == statics.Fixed {
				hold(2*end + 1)
			}
		}
		var u mat.VecDense
		require.NoError(t, u.SolveVec(k, load))

		r := solve(t, s.beam(), s.statics())
		e := r.extremes(t)
		largest = max(largest, math.Abs(inKN(e.ShearMost.Shear)), math.Abs(inKN(e.ShearLeast.Shear)),
			math.Abs(inKNm(e.MomentMost.Moment)), math.Abs(inKNm(e.MomentLeast.Moment)))
		for i := range cells {
			var f [4]float64 // on the element: force down and couple/h, at its two ends
			for row := range 4 {
				f[row] = -clamped[i][row]
				for c := range 4 {
					f[row] += stiffness[row][c] * u.AtVec(2*i+c)
				}
			}
			_, from := r.at(t, s.length*float64(i)/cells)
			to, _ := r.at(t, s.length*float64(i+1)/cells)
			require.InDelta(t, -f[0], inKN(from.Shear), 1e-9*largest)
			require.InDelta(t, f[1]*h, inKNm(from.Moment), 1e-9*largest)
			require.InDelta(t, f[2], inKN(to.Shear), 1e-9*largest)
			require.InDelta(t, -f[3]*h, inKNm(to.Moment), 1e-9*largest)
		}
	})
}
