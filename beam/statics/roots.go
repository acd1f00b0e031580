package statics

import "soffit.example/units"

// AppendZeroShears appends to dst, from left to right, every place within the
// span where the shear changes sign, through zero or in a jump, and returns the
// longer slice. Where it stays zero over a length in between, that is where it
// first vanishes. Touching zero is no change of sign, and the ends of the span
// are not places within it.
func (l *Line) AppendZeroShears(dst []units.Length) []units.Length {
	return l.appendRoots(dst, l.vNoise, false)
}

// AppendInflections does for the moment what [Line.AppendZeroShears] does for
// the shear: it appends the inflection points of the deflected beam.
func (l *Line) AppendInflections(dst []units.Length) []units.Length {
	return l.appendRoots(dst, l.mNoise, true)
}

// appendRoots follows the signs of the shear or the moment through all places
// between which it runs monotonically. A value within the noise has no sign.
func (l *Line) appendRoots(dst []units.Length, noise float64, moment bool) []units.Length {
	var (
		sign     float64 // of the last value that had one
		vanished bool    // a value since then had none,
		gone     float64 // the first of them here
	)
	for i := range l.pieces {
		p, h := &l.pieces[i], l.x[i+1]-l.x[i]
		turns, n := p.turns()
		t := 0.0
		for k := -1; k <= n; k++ {
			before := t
			var v, m float64
			switch {
			case k < 0:
				v, m = p.v, p.m
			case k == n:
				t, v, m = h, p.vEnd, p.mEnd
			case !(t < turns[k] && turns[k] < h):
				continue
			default:
				t = turns[k]
				v, m = p.shear(t), p.moment(t)
			}
			value := v
			if moment {
				value = m
			}
			switch value = flush(value, noise); {
			case value == 0:
				if !vanished {
					vanished, gone = true, l.x[i]+t
				}
				continue
			case value*sign < 0 && vanished:
				dst = append(dst, units.Metre.Of(gone))
			case value*sign < 0 && k < 0: // in a jump
				dst = append(dst, units.Metre.Of(l.x[i]))
			case value*sign < 0:
				dst = append(dst, units.Metre.Of(l.x[i]+p.root(before, t, moment)))
			}
			sign, vanished = sgn(value), false
		}
	}
	return dst
}

// root returns the place between lo and hi where the piece's moment, or else
// its shear, changes sign; it changes once. Newton's steps are taken where they
// stay within the bracket, and halving otherwise.
func (p *piece) root(lo, hi float64, moment bool) float64 {
	f := func(t float64) (value, slope float64) {
		if moment {
			return p.moment(t), p.shear(t)
		}
		return p.shear(t), -(p.w + t*p.s)
	}
	atLo, _ := f(lo)
	t := lo + (hi-lo)/2
	for range 200 { // halving alone needs fewer than 64 for a double's mantissa, and more only near zero
		value, slope := f(t)
		switch {
		case value == 0:
			return t
		case (value > 0) == (atLo > 0):
			lo = t
		default:
			hi = t
		}
		next := t - value/slope
		if !(lo < next && next < hi) {
			next = lo + (hi-lo)/2
		}
		if next == t || next <= lo || next >= hi {
			return next
		}
		t = next
	}
	return t
}

// sgn is the sign of a value other than zero.
func sgn(v float64) float64 {
	if v < 0 {
		return -1
	}
	return 1
}
