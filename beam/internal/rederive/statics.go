package rederive

import (
	"math"
	"slices"

	"soffit.example/beam"
	"soffit.example/beam/statics"
)

// member is the one span of a beam, case by case.
type member struct {
	length      float64
	faceL       float64
	faceR       float64
	left, right statics.SupportKind
	cases       [beam.Earthquake + 1]*caseLoads
	torques     []torque
	breaks      []float64
	combos      []combo
}

// combo is one factored combination.
type combo struct {
	name    string
	factors [beam.Earthquake + 1]float64
}

// caseLoads are the loads of a case and the forces at the left end under them.
type caseLoads struct {
	points  []place
	couples []place
	strips  []strip
	m0, v0  float64 // moment and shear at the left end
}

type place struct{ at, size float64 }

// strip is a distributed load, linear between its ends.
type strip struct{ from, to, start, end float64 }

// load is what the loads left of x take off the shear and the moment; right
// says whether those at x count.
func (c *caseLoads) load(x float64, right bool) (m, v float64) {
	for _, p := range c.points {
		if p.at < x || right && p.at == x {
			v -= p.size
			m -= p.size * (x - p.at)
		}
	}
	for _, p := range c.couples {
		if p.at < x || right && p.at == x {
			m += p.size
		}
	}
	for _, s := range c.strips {
		if x <= s.from {
			continue
		}
		t := math.Min(x, s.to) - s.from
		slope := (s.end - s.start) / (s.to - s.from)
		total := s.start*t + slope*t*t/2
		first := s.start*t*t/2 + slope*t*t*t/3 // about from
		v -= total
		m -= total*(x-s.from) - first
	}
	return m, v
}

// forces are the moment and the shear just left or just right of x.
func (c *caseLoads) forces(x float64, right bool) (m, v float64) {
	m, v = c.load(x, right)
	return m + c.m0 + c.v0*x, v + c.v0
}

// gauss are four points and weights on (-1, 1).
var gauss = [4][2]float64{
	{-0.8611363115940526, 0.3478548451374538}, {-0.3399810435848563, 0.6521451548625461},
	{0.3399810435848563, 0.6521451548625461}, {0.8611363115940526, 0.3478548451374538},
}

// solve finds the forces at the left end from the supports: equilibrium where
// that is enough, else compatibility of the elastic line, whose slope and
// deflection are integrals of the moment.
func (c *caseLoads) solve(l float64, left, right statics.SupportKind, breaks []float64) {
	gl, hl := c.load(l, true)
	var i0, i1, i2 float64 // integrals of the load's moment g: g, g (l-s), g s
	for k := 1; k < len(breaks); k++ {
		a, b := breaks[k-1], breaks[k]
		for _, p := range gauss {
			s := (a+b)/2 + p[0]*(b-a)/2
			g, _ := c.load(s, true)
			w := p[1] * (b - a) / 2
			i0, i1, i2 = i0+w*g, i1+w*g*(l-s), i2+w*g*s
		}
	}
	fixedL, fixedR := left == statics.Fixed, right == statics.Fixed
	switch {
	case left == statics.Free: // fixed at the right
		c.m0, c.v0 = 0, 0
	case right == statics.Free:
		c.v0 = -hl
		c.m0 = -gl - c.v0*l
	case fixedL && fixedR:
		// m l + v l2/2 = -i0 and m l2/2 + v l3/6 = -i1.
		c.v0 = (-i0*l/2 + i1) / (l * l * l / 12)
		c.m0 = (-i0 - c.v0*l*l/2) / l
	case fixedL:
		// m + v l = -gl and m l2/2 + v l3/6 = -i1.
		c.v0 = (i1 - gl*l*l/2) / (l * l * l / 3)
		c.m0 = -gl - c.v0*l
	case fixedR:
		c.v0 = -3 * i2 / (l * l * l)
	default:
		c.v0 = -gl / l
	}
}

// newMember takes the brief's span apart.
func newMember(p *printed, b *beam.Brief, ownWeight float64) *member {
	m := &member{
		length: p.length(b.Spans[0]),
		left:   b.Supports[0].Kind, right: b.Supports[1].Kind,
	}
	m.faceL = p.length(b.Supports[0].Width) / 2
	m.faceR = m.length - p.length(b.Supports[1].Width)/2
	m.breaks = []float64{0, m.length}
	of := func(c beam.LoadCase) *caseLoads {
		if m.cases[c] == nil {
			m.cases[c] = &caseLoads{}
		}
		return m.cases[c]
	}
	if ownWeight > 0 {
		of(beam.Dead).strips = append(of(beam.Dead).strips, strip{0, m.length, ownWeight, ownWeight})
	}
	for i := range b.Loads {
		l := &b.Loads[i]
		c := of(l.Case)
		at := p.length(l.At)
		switch l.Shape {
		case beam.Uniform:
			w := p.intensity(l.Intensity)
			c.strips = append(c.strips, strip{0, m.length, w, w})
		case beam.Partial:
			s := strip{p.length(l.From), p.length(l.To), p.intensity(l.Intensity), p.intensity(l.Intensity)}
			if l.Varies {
				s.end = p.intensity(l.IntensityEnd)
			}
			c.strips = append(c.strips, s)
			m.breaks = append(m.breaks, s.from, s.to)
		case beam.PointLoad:
			c.points = append(c.points, place{at, p.force(l.Force)})
			m.breaks = append(m.breaks, at)
		case beam.Couple:
			c.couples = append(c.couples, place{at, p.moment(l.Moment)})
			m.breaks = append(m.breaks, at)
		case beam.Torque, beam.UniformTorque:
			m.torques = append(m.torques, torque{
				at: at, size: p.moment(l.Moment), spread: l.Shape == beam.UniformTorque, shed: l.Path == beam.CompatibilityTorque, of: l.Case,
			})
			if l.Shape == beam.Torque {
				m.breaks = append(m.breaks, at)
			}
		}
	}
	slices.Sort(m.breaks)
	m.breaks = slices.Compact(m.breaks)
	for _, c := range m.cases {
		if c != nil {
			c.solve(m.length, m.left, m.right, m.breaks)
		}
	}
	m.combine()
	return m
}

// combine lists 5.3.1 for the cases that are loaded.
func (m *member) combine() {
	has := func(c beam.LoadCase) bool {
		return m.cases[c] != nil || slices.ContainsFunc(m.torques, func(t torque) bool { return t.of == c })
	}
	add := func(name string, factors map[beam.LoadCase]float64) {
		c := combo{name: name}
		for k, f := range factors {
			if k != 0 && has(k) {
				c.factors[k] = f
			}
		}
		m.combos = append(m.combos, c)
	}
	roofs := []beam.LoadCase{}
	for _, r := range []beam.LoadCase{beam.RoofLive, beam.Snow, beam.Rain} {
		if has(r) {
			roofs = append(roofs, r)
		}
	}
	orNone := append([]beam.LoadCase{0}, roofs...)
	const D, L, W, E = beam.Dead, beam.Live, beam.Wind, beam.Earthquake
	if has(D) {
		add("a", map[beam.LoadCase]float64{D: 1.4})
	}
	if has(L) {
		for _, r := range orNone {
			add("b", map[beam.LoadCase]float64{D: 1.2, L: 1.6, r: 0.5})
		}
	}
	for _, r := range roofs {
		add("c", map[beam.LoadCase]float64{D: 1.2, r: 1.6, L: 1})
		for _, s := range []float64{0.5, -0.5} {
			add("c", map[beam.LoadCase]float64{D: 1.2, r: 1.6, W: s})
		}
	}
	for _, s := range []float64{1, -1} {
		if has(W) {
			for _, r := range orNone {
				add("d", map[beam.LoadCase]float64{D: 1.2, W: s, L: 1, r: 0.5})
			}
			add("f", map[beam.LoadCase]float64{D: 0.9, W: s})
		}
		if has(E) {
			add("e", map[beam.LoadCase]float64{D: 1.2, E: s, L: 1, beam.Snow: 0.2})
			add("g", map[beam.LoadCase]float64{D: 0.9, E: s})
		}
	}
}

// at is the moment and the shear of a combination.
func (m *member) at(c *combo, x float64, right bool) (moment, shear float64) {
	for k, loads := range m.cases {
		if f := c.factors[k]; f != 0 {
			a, b := loads.forces(x, right)
			moment, shear = moment+f*a, shear+f*b
		}
	}
	return moment, shear
}

// section is what one combination asks of one section, on one side of it.
type section struct {
	combo int
	x     float64
	right bool
	m, v  float64
}

// stationsPerSpan are evenly spread; every place where a load begins, ends or
// acts is added on both sides.
const stationsPerSpan = 64

// stations evaluates every combination at every station of the span.
func (m *member) stations() []section {
	var out []section
	one := func(x float64, right bool) {
		var forces [beam.Earthquake + 1][2]float64
		for k, loads := range m.cases {
			if loads != nil {
				forces[k][0], forces[k][1] = loads.forces(x, right)
			}
		}
		for i := range m.combos {
			s := section{combo: i, x: x, right: right}
			for k, f := range m.combos[i].factors {
				s.m, s.v = s.m+f*forces[k][0], s.v+f*forces[k][1]
			}
			out = append(out, s)
		}
	}
	for i := 1; i < stationsPerSpan; i++ {
		one(m.length*float64(i)/stationsPerSpan, true)
	}
	one(m.faceL, true)
	one(m.faceR, false)
	for _, x := range m.breaks {
		if x > 0 {
			one(x, false)
		}
		if x < m.length {
			one(x, true)
		}
	}
	return out
}

// greatest is the greatest moment of a sense (sign 1 or -1) between the faces,
// refined from the stations by golden section, and a scale to tell nothing
// from something.
func (m *member) greatest(all []section, sign float64) (most, scale float64) {
	best := section{combo: -1}
	for _, s := range all {
		scale = math.Max(scale, math.Abs(s.m))
		if s.x >= m.faceL && s.x <= m.faceR && sign*s.m > most {
			most, best = sign*s.m, s
		}
	}
	if best.combo < 0 {
		return 0, scale
	}
	step := m.length / stationsPerSpan
	a, b := math.Max(m.faceL, best.x-step), math.Min(m.faceR, best.x+step)
	c := &m.combos[best.combo]
	f := func(x float64) float64 {
		v, _ := m.at(c, x, true)
		return sign * v
	}
	const g = 0.6180339887498949
	for range 40 {
		p, q := b-g*(b-a), a+g*(b-a)
		if f(p) > f(q) {
			b = q
		} else {
			a = p
		}
	}
	return math.Max(most, f((a+b)/2)), scale
}

// torque is a twisting moment about the axis: at a place, or spread evenly.
type torque struct {
	at, size float64
	spread   bool
	shed     bool // compatibility imposes it
	of       beam.LoadCase
}

// twisting is the torque of a combination at a place, and the part of it that
// may be shed. The twist of a prismatic bar with both ends held vanishes over
// its length, so that each end takes the share of the distance from the other.
func (m *member) twisting(c *combo, x float64, right bool) (all, shed float64) {
	for _, t := range m.torques {
		f := c.factors[t.of]
		if f == 0 {
			continue
		}
		start := 0.0 // what the left end takes
		at := t.at
		if t.spread {
			at = m.length / 2
		}
		switch {
		case m.left != statics.Free && m.right != statics.Free:
			start = (m.length - at) / m.length
		case m.left != statics.Free:
			start = 1
		}
		passed := 0.0
		switch {
		case t.spread:
			passed = x / m.length
		case t.at < x || right && t.at == x:
			passed = 1
		}
		v := f * t.size * (start - passed)
		all += v
		if t.shed {
			shed += v
		}
	}
	return all, shed
}
