package statics

import (
	"errors"
	"slices"

	"soffit.example/units"
)

// MaxPieces is the most polynomial pieces that one [Response] may hold: its
// lines times the lengths between breakpoints. It bounds the memory to 48 MB.
const MaxPieces = 1_000_000

// Analyze finds the forces of a beam for each case that its loads name, in the
// order in which they first name it.
//
// The error joins every fault of the input, each a [*RangeError], a
// [*FieldError] or a [*SpanCountError], or is a [*MechanismError] if the
// supports let the beam move.
func Analyze(b Beam, loads []Load) (*Response, error) {
	if faults := b.check(); faults != nil {
		return nil, errors.Join(faults...)
	}
	actions, faults := checkLoads(b, loads)
	if faults != nil {
		return nil, errors.Join(faults...)
	}
	if err := b.stability(); err != nil {
		return nil, err
	}

	var ids []string
	index := make(map[string]int)
	caseOf := make([]int, len(loads))
	for i, l := range loads {
		c, seen := index[l.Case]
		if !seen {
			c = len(ids)
			index[l.Case] = c
			ids = append(ids, l.Case)
		}
		caseOf[i] = c
	}
	length := b.Spans[0].Length.In(units.Metre)
	r, err := newResponse(ids, index, breakpoints(length, actions))
	if err != nil {
		return nil, err
	}
	sums := make([]endSums, len(r.ids))
	for i := range sums {
		sums[i].l = length
	}
	for i := range actions {
		sums[caseOf[i]].add(&actions[i])
	}
	lines := r.spans[0].lines
	for i := range actions {
		lines[caseOf[i]].load(&actions[i])
	}
	for c := range lines {
		e := sums[c].under(b.Supports[0].Kind, b.Supports[1].Kind)
		lines[c].integrate(e)
		at := r.reactionsOf(c)
		at[0] = reaction{force: e.rA, moment: e.mA}
		at[1] = reaction{force: e.rB, moment: -e.mB}
	}
	return r, nil
}

// breakpoints returns the ends of the span and every place where a load
// begins, ends or acts, from left to right and each once.
func breakpoints(length float64, actions []action) []float64 {
	x := make([]float64, 0, 2*len(actions)+2)
	x = append(x, 0, length)
	for i := range actions {
		x = append(x, actions[i].from, actions[i].to)
	}
	slices.Sort(x)
	return slices.Compact(x)
}

// load adds a load to the line, before it is integrated: intensities to the
// pieces, and jumps to the shear and moment with which a piece begins. What
// acts at the right end is kept in the end values of the last piece.
func (l *Line) load(a *action) {
	total := a.total(l.length())
	l.vNoise += noise * total
	l.mNoise += noise * total * l.length()
	i, _ := slices.BinarySearch(l.x, a.from)
	switch {
	case a.isStrip():
		s := a.slope()
		for ; l.x[i] < a.to; i++ {
			l.pieces[i].w += a.w + s*(l.x[i]-a.from)
			l.pieces[i].s += s
		}
	case i < len(l.pieces):
		l.pieces[i].v -= a.force
		l.pieces[i].m += a.couple
	default:
		l.pieces[i-1].vEnd += a.force
		l.pieces[i-1].mEnd -= a.couple
	}
}

// integrate runs the loads gathered by load through the span, from what its
// left end puts on it to what its right end does.
func (l *Line) integrate(e ends) {
	v, m := e.rA, e.mA
	last := len(l.pieces) - 1
	for i := range l.pieces {
		p := &l.pieces[i]
		v += p.v
		m += p.m
		p.v, p.m = v, m
		if i == last {
			// The right end is known without the rounding gathered on the way.
			p.vEnd -= e.rB
			p.mEnd += e.mB
			return
		}
		h := l.x[i+1] - l.x[i]
		v, m = p.shear(h), p.moment(h)
		p.vEnd, p.mEnd = v, m
	}
}
