package rederive

import (
	"math"
	"slices"
)

// steelAt is steel at a depth from the compression face.
type steelAt struct{ depth, area, fy float64 }

// bending is a section at its nominal strength.
type bending struct {
	ok      bool
	c       float64
	mn      float64 // about the centroid of the concrete
	strain  float64 // εt of the layer farthest from the compression face
	phi     float64
	ety     float64
	leastEt float64
}

// fibres is a section as bending sees it.
type fibres struct {
	p       *printed
	s       *shape
	face    int // that is pressed: 0 bottom, 1 top
	fc      float64
	deduct  bool
	rounded bool
}

// steelForce is the force of a layer, compression positive, for a neutral axis
// at c.
func (f *fibres) steelForce(c float64, s steelAt) float64 {
	stress := math.Max(-s.fy, math.Min(s.fy, f.p.es*0.003*(c-s.depth)/c))
	if f.deduct && s.depth <= f.p.beta1(f.fc)*c {
		stress -= 0.85 * f.fc
	}
	return stress * s.area
}

func (f *fibres) balance(c float64, steel []steelAt) float64 {
	area, _ := f.s.pressed(f.face, math.Min(f.p.beta1(f.fc)*c, f.s.h))
	sum := 0.85 * f.fc * area
	for _, s := range steel {
		sum += f.steelForce(c, s)
	}
	return sum
}

// strength is Mn by strain compatibility under a factored axial force,
// compression positive: the balance of forces is followed from a shallow
// neutral axis downwards. It rises except where the edge of the block passes a
// layer, so that between those depths there is at most one zero; the first is
// taken.
func (f *fibres) strength(steel []steelAt, pu float64) bending {
	var out bending
	if len(steel) == 0 {
		return out
	}
	far := steel[0]
	edges := []float64{f.s.h * 1e-9, 1e3 * f.s.h}
	beta := f.p.beta1(f.fc)
	for _, s := range steel {
		edges = append(edges, s.depth/beta)
		if s.depth > far.depth*(1+1e-12) || s.depth >= far.depth*(1-1e-12) && s.fy < far.fy {
			far = s
		}
	}
	out.ety = f.p.yieldStrain(far.fy, f.rounded)
	_, out.leastEt = f.p.strains(out.ety)
	phi := func(c float64) float64 { return f.p.phi(0.003*(far.depth-c)/c, out.ety) }
	rest := func(c float64) float64 {
		n := f.balance(c, steel)
		if pu != 0 {
			n -= pu / phi(c)
		}
		return n
	}
	slices.Sort(edges)
	for i := 1; i < len(edges) && !out.ok; i++ {
		low, high := edges[i-1], edges[i]
		low, high = low+1e-13*low, high-1e-13*high
		if !(low < high) || rest(low) > 0 || rest(high) < 0 {
			continue
		}
		for range 100 {
			mid := (low + high) / 2
			if mid == low || mid == high {
				break
			}
			if rest(mid) < 0 {
				low = mid
			} else {
				high = mid
			}
		}
		out.c, out.ok = (low+high)/2, true
	}
	if !out.ok {
		return out
	}
	middle := f.s.centroid
	if f.face == 0 {
		middle = f.s.h - middle
	}
	area, centre := f.s.pressed(f.face, math.Min(beta*out.c, f.s.h))
	out.mn = 0.85 * f.fc * area * (middle - centre)
	for _, s := range steel {
		out.mn += f.steelForce(out.c, s) * (middle - s.depth)
	}
	out.strain = 0.003 * (far.depth - out.c) / out.c
	out.phi = phi(out.c)
	return out
}

// design is the lesser strength, and the lesser strain, with an axial force and
// without; not ok where there is no equilibrium.
func (f *fibres) design(steel []steelAt, pu float64) bending {
	out := f.strength(steel, 0)
	if pu == 0 || !out.ok {
		return out
	}
	with := f.strength(steel, pu)
	if !with.ok {
		return with
	}
	if with.phi*with.mn < out.phi*out.mn {
		out.phi, out.mn, out.c = with.phi, with.mn, with.c
	}
	out.strain = math.Min(out.strain, with.strain)
	return out
}
