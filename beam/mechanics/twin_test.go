package mechanics

// The hand-written twin of the kernel, for the benchmarks: a rectangle, the
// rectangular block and plain float64, for sagging without axial force, and
// nothing else. It does the same work: layers of any number, displaced concrete
// deducted inside the block, the least of the equilibria, what each layer does,
// and the moment.
type twin struct {
	width, intensity, factor, ultimate float64
	layers                             []twinLayer
}

type twinLayer struct {
	depth, area, modulus, yield      float64
	strain, stress, displaced, force float64
}

// balance returns compression less tension with the neutral axis at c.
func (t *twin) balance(c float64) float64 {
	a := t.factor * c
	sum := t.intensity * t.width * a
	for i := range t.layers {
		l := &t.layers[i]
		f := l.modulus * t.ultimate * (c - l.depth) / c
		if f > l.yield {
			f = l.yield
		} else if f < -l.yield {
			f = -l.yield
		}
		if l.depth < a {
			f -= t.intensity
		}
		sum += l.area * f
	}
	return sum
}

// solve finds the least depth by halving and returns it with the moment. The
// balance falls only where the edge of the block passes a layer, so that the
// first such depth with a balance above zero just before it closes the bracket.
func (t *twin) solve(height float64) (c, moment float64) {
	lo, hi := 0.0, 2*height
	for i := range t.layers {
		at := t.layers[i].depth / t.factor
		switch {
		case at <= lo || at >= hi:
		case t.balance(at) >= 0: // the layer is not yet inside
			hi = at
		}
	}
	for hi-lo > 1e-13*hi {
		mid := (lo + hi) / 2
		if t.balance(mid) < 0 {
			lo = mid
		} else {
			hi = mid
		}
	}
	c = (lo + hi) / 2
	a := t.factor * c
	moment = t.intensity * t.width * a * (height/2 - a/2)
	for i := range t.layers {
		l := &t.layers[i]
		l.strain = t.ultimate * (c - l.depth) / c
		l.stress = max(-l.yield, min(l.yield, l.modulus*l.strain))
		l.displaced = 0
		if l.depth < a {
			l.displaced = t.intensity
		}
		l.force = l.area * (l.stress - l.displaced)
		moment += l.force * (height/2 - l.depth)
	}
	return c, moment
}
