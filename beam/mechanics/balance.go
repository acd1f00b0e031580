package mechanics

import (
	"cmp"
	"math"
	"slices"

	"soffit.example/units"
)

// The search for equilibria.
//
// Let k be the depth of the section over the depth of the neutral axis: the
// curvature, in units of ultimate strain over depth. At a fraction x of the
// depth the strain is 1 - k·x ultimate strains. The concrete of a rectangle,
// from x1 to x2 and of width w, gives the force
//
//	w·(depth/k)·(S(1 - k·x1) - S(1 - k·x2))
//
// where S is the integral of the law. Times k over the depth, it is a polynomial
// in k as long as x1 and x2 keep to their pieces of the law, and so is the force
// of a bar as long as it keeps to its branch and its piece. The scan runs
// through the values of k at which anything changes, from great curvature to
// none, that is from the least neutral-axis depth up, keeps the polynomial of
// the present interval, and isolates its roots there.
//
// Where the width varies in straight lines, integration by parts once more gives
// the force of the concrete as
//
//	(depth/k)·Σ(jump of width)·S(1 - k·x) + (depth/k²)·Σ(jump of slope)·T(1 - k·x)
//
// summed over the levels x at which the width or its slope jumps, T being the
// integral of S. It becomes a polynomial times k², and all else is as before.

// An edge is a level at which the width of the section, or the slope of its
// sides, changes.
type edge struct {
	at           float64
	weight, bend float64 // width and slope below it less those above, m and m over the depth
	width, slope float64 // width and slope just below it
	piece        int     // of the law at the edge's strain; -1 below the first
}

// A bar is a layer of steel.
type bar struct {
	at      float64
	area    float64 // m² over the depth
	elastic float64 // stress at the ultimate strain if it did not yield, Pa
	yield   float64 // Pa
	yieldAt float64 // yield strain over ultimate strain
	branch  branch
	piece   int // of the law at the bar's strain; -1 below the first
}

// A branch of the stress-strain line of steel.
type branch int8

const (
	tensionYield branch = iota
	elasticBranch
	compressionYield
)

// stress returns the stress in Pa at a strain over the ultimate strain, by the
// branch that the bar is on.
func (b *bar) stress(strain float64) float64 {
	switch b.branch {
	case tensionYield:
		return -b.yield
	case compressionYield:
		return b.yield
	}
	return b.elastic * strain
}

// An event is a k below which one edge or bar is on its next piece or branch.
type event struct {
	k     float64
	kind  eventKind
	index int32
}

type eventKind int8

const (
	edgePiece eventKind = iota
	barPiece
	barBranch
)

func (s *Solver) listEvents() {
	s.events = s.events[:0]
	for i := range s.edges {
		if at := s.edges[i].at; at > 0 {
			s.listPieces(edgePiece, i, 1/at)
		}
	}
	for i := range s.bars {
		b := &s.bars[i]
		if b.at == 0 {
			continue
		}
		perAt := 1 / b.at
		if s.deduct {
			s.listPieces(barPiece, i, perAt)
		}
		s.events = append(s.events, event{(1 + b.yieldAt) * perAt, barBranch, int32(i)})
		if b.yieldAt < 1 {
			s.events = append(s.events, event{(1 - b.yieldAt) * perAt, barBranch, int32(i)})
		}
	}
	sortEvents(s.events)
}

// sortEvents puts the greatest k first. A few events, as most beams have, are
// sorted in half the time by insertion without a comparing function.
func sortEvents(events []event) {
	if len(events) > 64 {
		slices.SortFunc(events, func(a, b event) int { return cmp.Compare(b.k, a.k) })
		return
	}
	for i := 1; i < len(events); i++ {
		e := events[i]
		j := i
		for ; j > 0 && events[j-1].k < e.k; j-- {
			events[j] = events[j-1]
		}
		events[j] = e
	}
}

func (s *Solver) listPieces(kind eventKind, index int, perAt float64) {
	for j := range s.law.pieces {
		s.events = append(s.events, event{(1 - s.law.pieces[j].from) * perAt, kind, int32(index)})
	}
}

// solve fills roots with every k at equilibrium, from the greatest down, and
// reports the first to dst.
func (s *Solver) solve(dst *Ultimate) {
	s.roots = s.roots[:0]
	degree := max(2, s.law.degree+1) + s.power - 1
	g := s.balance()
	// There are events: the far face meets the start of the law.
	hi := math.Max(math.Min(g.rootBound(), 1e15), 2*s.events[0].k)
	before := math.NaN() // balance at the near end of the interval before
	for i := 0; i <= len(s.events); i++ {
		lo := 0.0
		if i < len(s.events) {
			lo = s.events[i].k
		}
		if lo < hi {
			end, bare := s.bare(&g, lo, hi, before)
			if !bare {
				end = s.search(&g, degree, lo, hi, before)
				if len(s.roots) > 0 && dst.NeutralAxis.IsZero() {
					s.roots[0] = s.settle(dst, &g, lo == 0)
				}
			}
			before, hi = end, lo
		}
		if i < len(s.events) {
			s.pass(&g, s.events[i])
		}
	}
	s.roots = distinct(s.roots)
}

// distinct leaves out neighbours that are the same: a root on the border of two
// intervals may have been found in both.
func distinct(roots []float64) []float64 {
	return slices.CompactFunc(roots, func(a, b float64) bool { return math.Abs(a-b) <= 1e-10*a })
}

// bare reports an interval that a look at the ends of the balance g shows to have
// no root, nor one at hi, and returns the balance at lo. Under a block the force
// rises with the neutral-axis depth between any two jumps, so that ends alike
// enclose no root. before is as for search.
func (s *Solver) bare(g *polynomial, lo, hi, before float64) (end float64, bare bool) {
	if s.law.degree > 0 {
		return 0, false
	}
	var start float64
	switch {
	case lo == 0: // the terms below are rounding, see search
		end = g[s.power]
		start = end + hi*g[s.power+1]
	case s.power > 1:
		start, end = g.at(hi), g.at(lo)
	default:
		start, end = g[0]+hi*(g[1]+hi*g[2]), g[0]+lo*(g[1]+lo*g[2])
	}
	return end, start*end > 0 && !(start*before < 0)
}

// settle reports the first root, of the balance g, and returns it. Where a law of
// thin and steep pieces has cost the polynomial some digits, the root is first
// improved by Newton's steps on the sum of the forces themselves.
func (s *Solver) settle(dst *Ultimate, g *polynomial, divided bool) float64 {
	k := s.roots[0]
	size := s.report(dst, k)
	residual := dst.Residual.In(units.Newton)
	for range 4 {
		if math.Abs(residual) <= 1e-13*size {
			break
		}
		slope := g.slope(k) * s.depth
		if !divided {
			slope /= s.powerOf(k)
		}
		next := k - residual/slope
		if !(math.Abs(next-k) <= 1e-6*k) {
			break // a bar at a jump: no depth leaves nothing over
		}
		s.report(dst, next)
		after := dst.Residual.In(units.Newton)
		if math.Abs(after) >= math.Abs(residual) {
			s.report(dst, k)
			break
		}
		k, residual = next, after
	}
	return k
}

// search appends the roots of the balance g between lo and hi, the border at hi
// included, and returns the balance at lo. before is the balance at hi by the
// polynomial of the interval above.
func (s *Solver) search(g *polynomial, degree int, lo, hi, before float64) float64 {
	if lo == 0 {
		// Every edge is on the same piece as the compression face, so that
		// the lowest terms cancel: what is left has the factor k, or k².
		s.divide(g)
		before /= s.powerOf(hi)
	}
	b := g.bernstein(degree, lo, hi)
	if s.crosses(g, hi, before, b[degree]) {
		s.roots = append(s.roots, hi)
	}
	if b.signChanges(degree) > 0 {
		// The running sum has gathered rounding: take it afresh.
		*g = s.balance()
		if lo == 0 {
			s.divide(g)
		}
		b = g.bernstein(degree, lo, hi)
		s.roots = g.appendRoots(s.roots, &b, degree, lo, hi)
	}
	if b[0] == 0 && lo > 0 {
		s.roots = append(s.roots, lo)
	}
	return b[0]
}

// powerOf returns the power of k that makes a balance of forces a polynomial.
func (s *Solver) powerOf(k float64) float64 {
	if s.power == 1 {
		return k
	}
	return k * k
}

// divide takes that power out of g.
func (s *Solver) divide(g *polynomial) {
	for range s.power {
		g.divide()
	}
}

// crosses reports whether the balance passes through zero at the border k of two
// intervals, where it was before and is now after, by g. A rise through zero is
// an equilibrium, with a bar at a jump if it is a true jump. A drop through zero
// is one only if it is no jump but rounding: the drop where the edge of a block
// passes a bar leaves nothing in balance.
func (s *Solver) crosses(g *polynomial, k, before, after float64) bool {
	if before < 0 {
		return after >= 0
	}
	return before > 0 && after <= 0 && before-after <= 1e-14*g.magnitude(k)
}

// balance returns the polynomial of the present pieces and branches: the sum of
// forces, compression positive, over the depth of the section and times k, or k²
// where a part tapers.
func (s *Solver) balance() polynomial {
	var g polynomial
	g[s.power] = -s.axial
	for i := range s.edges {
		s.addEdge(&g, &s.edges[i], 1)
	}
	for i := range s.bars {
		s.addSteel(&g, &s.bars[i], 1)
		s.addDisplaced(&g, &s.bars[i], 1)
	}
	return g
}

// pass takes an edge or a bar to its next piece or branch.
func (s *Solver) pass(g *polynomial, e event) {
	switch e.kind {
	case edgePiece:
		at := &s.edges[e.index]
		s.addEdge(g, at, -1)
		at.piece++
		s.addEdge(g, at, 1)
	case barPiece:
		b := &s.bars[e.index]
		s.addDisplaced(g, b, -1)
		b.piece++
		s.addDisplaced(g, b, 1)
	case barBranch:
		b := &s.bars[e.index]
		s.addSteel(g, b, -1)
		b.branch++
		s.addSteel(g, b, 1)
	}
}

func (s *Solver) addEdge(g *polynomial, e *edge, sign float64) {
	if e.piece >= 0 {
		p := &s.law.pieces[e.piece]
		g.addComposed(&p.integral, s.law.degree+1, 1-p.from, e.at, sign*e.weight, s.power-1)
		if e.bend != 0 {
			g.addComposed(&p.second, s.law.degree+2, 1-p.from, e.at, sign*e.bend, 0)
		}
	}
}

func (s *Solver) addDisplaced(g *polynomial, b *bar, sign float64) {
	if s.deduct && b.piece >= 0 {
		p := &s.law.pieces[b.piece]
		g.addComposed(&p.stress, s.law.degree, 1-p.from, b.at, -sign*b.area, s.power)
	}
}

func (s *Solver) addSteel(g *polynomial, b *bar, sign float64) {
	switch b.branch {
	case tensionYield:
		g[s.power] -= sign * b.area * b.yield
	case compressionYield:
		g[s.power] += sign * b.area * b.yield
	default:
		g[s.power] += sign * b.area * b.elastic
		g[s.power+1] -= sign * b.area * b.elastic * b.at
	}
}
