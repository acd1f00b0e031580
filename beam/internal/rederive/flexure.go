package rederive

import (
	"math"
	"slices"
)

// steelAt is steel at a depth from the compression face.
type steelAt struct{ depth, area float64 }

// bending is a section at its nominal strength.
type bending struct {
	ok      bool
	c       float64
	mn      float64
	strain  float64 // εt of the layer farthest from the compression face
	phi     float64
	ety     float64
	leastEt float64
}

// strength is Mn by strain compatibility: the balance of forces is followed
// from a shallow neutral axis downwards. It rises except where the edge of the
// block passes a layer, so that between those depths there is at most one zero;
// the first is taken.
func (p *printed) strength(b, h, fc, fy float64, steel []steelAt, deduct, rounded bool) bending {
	beta := p.beta1(fc)
	out := bending{ety: p.yieldStrain(fy, rounded)}
	_, out.leastEt = p.strains(out.ety)
	if len(steel) == 0 {
		return out
	}
	layer := func(c float64, s steelAt) float64 { // compression positive
		strain := 0.003 * (c - s.depth) / c
		f := math.Max(-fy, math.Min(fy, p.es*strain))
		if deduct && s.depth <= beta*c {
			f -= 0.85 * fc
		}
		return f * s.area
	}
	balance := func(c float64) float64 {
		sum := 0.85 * fc * b * math.Min(beta*c, h)
		for _, s := range steel {
			sum += layer(c, s)
		}
		return sum
	}
	edges := []float64{h * 1e-9, 1e3 * h}
	for _, s := range steel {
		edges = append(edges, s.depth/beta)
	}
	slices.Sort(edges)
	found := false
	for i := 1; i < len(edges) && !found; i++ {
		low, high := edges[i-1], edges[i]
		low, high = low+1e-13*low, high-1e-13*high
		if !(low < high) || balance(low) > 0 || balance(high) < 0 {
			continue
		}
		for range 200 {
			mid := (low + high) / 2
			if balance(mid) < 0 {
				low = mid
			} else {
				high = mid
			}
		}
		out.c, found = (low+high)/2, true
	}
	if !found {
		return out
	}
	out.ok = true
	a := math.Min(beta*out.c, h)
	out.mn = 0.85 * fc * b * a * (h/2 - a/2)
	far := 0.0
	for _, s := range steel {
		out.mn += layer(out.c, s) * (h/2 - s.depth)
		far = math.Max(far, s.depth)
	}
	out.strain = 0.003 * (far - out.c) / out.c
	out.phi = p.phi(out.strain, out.ety)
	return out
}
