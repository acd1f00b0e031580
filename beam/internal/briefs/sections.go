package briefs

import (
	"math"

	"soffit.example/beam"
	"soffit.example/units"
)

// section draws a shape. Width and depth of the maker are those of the web.
func (m *maker) section(member bool) {
	m.width = m.either(step(m.between(8, 26), 1), step(m.between(200, 650), 25))
	ratio := m.between(0.9, 2.8)
	if m.small {
		ratio = min(ratio, m.either(38, 950)/m.width)
	}
	m.depth = step(m.width*ratio, m.either(1, 25))
	if m.chance(4) {
		m.depth = m.either(step(m.between(7, 11), 1), step(m.between(175, 275), 25))
	}
	s := &m.b.Section
	*s = beam.Section{Shape: beam.Rectangular, Width: m.length(m.width), Depth: m.length(m.depth)}
	m.area = m.width * m.depth
	if m.small {
		if m.of == flanged {
			m.flange(pick(m, beam.Tee, beam.Tee, beam.InvertedTee), false)
			s.Isolated = false
		}
		return
	}
	switch r := m.IntN(100); {
	case r < 36:
	case r < 60:
		m.flange(beam.Tee, member)
	case r < 68:
		m.flange(beam.Ell, member)
	case r < 77:
		m.flange(beam.InvertedTee, member)
	case r < 82:
		m.joist(member)
	case r < 87:
		m.trapezoid()
	case r < 94:
		m.box()
	default:
		m.stack()
	}
}

// flange gives the web a flange or ledges, by their width or by the slab.
func (m *maker) flange(shape beam.Shape, member bool) {
	s := &m.b.Section
	s.Shape = shape
	thick := min(m.either(step(m.between(4, 9), 0.5), step(m.between(100, 230), 10)), step(0.45*m.depth, m.either(0.5, 10)))
	s.FlangeThickness = m.length(thick)
	if shape == beam.InvertedTee {
		thick = step(m.depth*m.between(0.3, 0.5), m.either(1, 25))
		s.FlangeThickness = m.length(thick)
		wide := m.width + 2*m.either(step(m.between(4, 10), 1), step(m.between(100, 250), 25))
		s.FlangeWidth = m.length(wide)
		m.area += (wide - m.width) * thick
		return
	}
	if member && m.chance(50) {
		clear := func() units.Length {
			return m.length(m.either(step(m.between(24, 240), 1), step(m.between(600, 6000), 50)))
		}
		s.Slab.ClearLeft = clear()
		if shape == beam.Tee {
			s.Slab.ClearRight = clear()
		}
		m.area += 6 * thick * thick
		return
	}
	wide := step(m.width*m.between(1.3, 4), m.either(1, 25))
	switch {
	case m.chance(25): // wide enough for its steel to be spread
		wide = step(m.width*m.between(4, 9), m.either(1, 25))
	case m.chance(10):
		wide = m.width // a tee that is a rectangle
	case shape == beam.Tee && m.chance(12):
		s.Isolated = true
		thick = max(thick, step(0.5*m.width+m.either(0.5, 10), m.either(0.5, 10)))
		if thick >= 0.6*m.depth {
			s.Isolated, thick = false, step(0.4*m.depth, m.either(0.5, 10))
		}
		s.FlangeThickness = m.length(thick)
		wide = min(wide, 4*m.width)
	}
	s.FlangeWidth = m.length(wide)
	m.area += (wide - m.width) * thick
}

// joist makes a rib of a joist floor, mostly within the limits of one.
func (m *maker) joist(member bool) {
	m.width = m.either(step(m.between(5.5, 9), 0.5), step(m.between(140, 230), 10))
	if m.chance(8) {
		m.width = m.either(step(m.between(3.5, 5), 0.5), step(m.between(90, 120), 10))
	}
	m.depth = step(m.width*m.between(2, 3.6), m.either(0.5, 10))
	clear := m.either(step(m.between(20, 31), 1), step(m.between(500, 760), 20))
	thick := m.either(step(m.between(2, 4.5), 0.5), step(m.between(50, 110), 10))
	m.b.Section = beam.Section{
		Shape: beam.Tee, Width: m.length(m.width), Depth: m.length(m.depth), FlangeThickness: m.length(thick), Joist: true,
	}
	s := &m.b.Section
	m.area = m.width*m.depth + clear*thick
	if member {
		s.Slab = beam.Slab{ClearLeft: m.length(clear), ClearRight: m.length(clear)}
		return
	}
	s.FlangeWidth = m.length(m.width + clear)
}

// outline makes the section a polygon of x and y in turn, moved off the origin.
func (m *maker) outline(coordinates ...float64) {
	m.b.Section = beam.Section{Shape: beam.Polygon, Outline: m.points(coordinates)}
	if m.chance(50) {
		for i, j := 0, len(m.b.Section.Outline)-1; i < j; i, j = i+1, j-1 {
			o := m.b.Section.Outline
			o[i], o[j] = o[j], o[i]
		}
	}
}

func (m *maker) points(coordinates []float64) (out []beam.Point) {
	const dx, dy = 7, -11
	for i := 0; i+1 < len(coordinates); i += 2 {
		out = append(out, beam.Point{X: m.length(coordinates[i] + dx), Y: m.length(coordinates[i+1] + dy)})
	}
	return out
}

// trapezoid is a web with sloping sides, wider above or below.
func (m *maker) trapezoid() {
	w, h := m.width, m.depth
	e, f := step(w*m.between(0, 0.4), m.either(0.5, 10)), step(w*m.between(0, 0.4), m.either(0.5, 10))
	m.area = w*h + (e+f)*h/2
	if m.chance(60) {
		m.outline(0, 0, w, 0, w+f, h, -e, h)
		return
	}
	m.outline(-e, 0, w+f, 0, w, h, 0, h)
}

// box is a box girder, or a rectangle with a duct too small to make it one.
func (m *maker) box() {
	m.width = m.either(step(m.between(18, 40), 1), step(m.between(450, 1000), 25))
	m.depth = step(m.width*m.between(0.9, 1.7), m.either(1, 25))
	w, h := m.width, m.depth
	m.outline(0, 0, w, 0, w, h, 0, h)
	wall := func() float64 { return m.either(step(m.between(5, 9), 0.5), step(m.between(125, 225), 10)) }
	side, bottom, top := wall(), wall(), wall()
	if m.chance(15) {
		side, bottom, top = 0.42*w, 0.45*h, 0.45*h
	}
	x, y := w-side, h-top
	m.area = w*h - (x-side)*(y-bottom)
	m.b.Section.Voids = [][]beam.Point{m.points([]float64{side, bottom, x, bottom, x, y, side, y})}
	if m.chance(40) { // chamfered inside
		c := min(x-side, y-bottom) * 0.2
		m.b.Section.Voids[0] = m.points([]float64{side + c, bottom, x - c, bottom, x, bottom + c, x, y - c, x - c, y, side + c, y, side, y - c, side, bottom + c})
	}
}

// stack is a web with ledges above or below, on one side or both.
func (m *maker) stack() {
	w, h := m.width, m.depth
	ledge := func() (out, thick float64) {
		if m.chance(35) {
			return 0, math.Round(h / 4)
		}
		return m.either(step(m.between(2, 14), 0.5), step(m.between(50, 350), 10)), step(h*m.between(0.15, 0.3), m.either(0.5, 10))
	}
	a, t1 := ledge()
	b, t2 := ledge()
	c, t3 := ledge()
	d, t4 := ledge()
	m.area = w*h + a*t1 + b*t2 + c*t3 + d*t4
	// Bottom right, top right, top left, bottom left, leaving out what has no width.
	xy := []float64{}
	add := func(x, y float64) { xy = append(xy, x, y) }
	ends := func(out, x, sign, from, to float64) {
		if out > 0 {
			add(x+sign*out, from)
			add(x+sign*out, to)
			add(x, to)
			return
		}
		add(x, from)
	}
	ends(a, w, 1, 0, t1)
	if b > 0 {
		add(w, h-t2)
		add(w+b, h-t2)
		add(w+b, h)
	} else {
		add(w, h)
	}
	ends(c, 0, -1, h, h-t3)
	if d > 0 {
		add(0, t4)
		add(-d, t4)
		add(-d, 0)
	} else {
		add(0, 0)
	}
	m.outline(xy...)
}
