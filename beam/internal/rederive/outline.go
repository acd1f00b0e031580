package rederive

import (
	"cmp"
	"math"
	"slices"

	"soffit.example/beam"
)

// point is a corner, x to the right and y downwards from the top face.
type point struct{ x, y float64 }

// ring is a closed line of corners.
type ring []point

// band is the concrete between two levels, counted from the top face: its net
// width changes linearly from w0 at y0 to w1 at y1.
type band struct{ y0, y1, w0, w1 float64 }

func (b *band) area() float64 { return (b.w0 + b.w1) / 2 * (b.y1 - b.y0) }

// moment is the first moment of area about the top face.
func (b *band) moment() float64 {
	t := b.y1 - b.y0
	return b.area()*b.y0 + t*t*(b.w0+2*b.w1)/6
}

// shape is a section of concrete.
type shape struct {
	outer ring
	bands []band // from the top down

	h     float64
	bw    float64 // least net width at any level
	strip float64 // width of the upright strip in which the stirrups stand

	faces            [2]float64 // widths of the bottom and the top face
	gross, enclosed  float64
	perimeter        float64
	centroid         float64 // from the top face
	flange           int     // face with a flange: 0 bottom, 1 top, -1 none
	over             [2]float64
	thick            float64 // of the flange
	hollow           bool
	side, above, low float64 // least walls of a hollow: beside, above and below it
}

// outlineOf is the outline of a section in the units of the edition; clear is
// the clear span, for the effective width of a slab.
func (p *printed) outlineOf(s *beam.Section, clear float64) (outer ring, voids []ring, over [2]float64) {
	if s.Shape == beam.Polygon {
		rings := []ring{}
		for _, corners := range append([][]beam.Point{s.Outline}, s.Voids...) {
			r := ring{}
			for _, c := range corners {
				r = append(r, point{p.length(c.X), -p.length(c.Y)})
			}
			rings = append(rings, r)
		}
		return rings[0], rings[1:], over
	}
	w, h, t := p.length(s.Width), p.length(s.Depth), p.length(s.FlangeThickness)
	over = p.overhangs(s, clear)
	l, r := over[0], over[1]
	switch {
	case s.Shape == beam.Rectangular || l+r == 0:
		return ring{{0, 0}, {w, 0}, {w, h}, {0, h}}, nil, over
	case s.Shape == beam.InvertedTee:
		return ring{{0, 0}, {w, 0}, {w, h - t}, {w + r, h - t}, {w + r, h}, {-l, h}, {-l, h - t}, {0, h - t}}, nil, over
	}
	return ring{{-l, 0}, {w + r, 0}, {w + r, t}, {w, t}, {w, h}, {0, h}, {0, t}, {-l, t}}, nil, over
}

// overhangs are the widths of the flange beside the web: as given, or those of
// 6.3.2.1 for the slab.
func (p *printed) overhangs(s *beam.Section, clear float64) [2]float64 {
	if s.Shape == beam.Rectangular {
		return [2]float64{}
	}
	if s.Slab == (beam.Slab{}) {
		rest := p.length(s.FlangeWidth) - p.length(s.Width)
		if s.Shape == beam.Ell {
			return [2]float64{0, rest}
		}
		return [2]float64{rest / 2, rest / 2}
	}
	t := p.length(s.FlangeThickness)
	left, right := p.length(s.Slab.ClearLeft), p.length(s.Slab.ClearRight)
	times, share := 8.0, 8.0
	if left == 0 || right == 0 {
		times, share = 6, 12
	}
	of := func(next float64) float64 {
		if next == 0 {
			return 0
		}
		return math.Min(times*t, math.Min(next/2, clear/share))
	}
	return [2]float64{of(left), of(right)}
}

// edge is a side of a ring that spans a band: where it is at both levels.
type edge struct {
	x0, x1 float64
}

// spanning lists the edges of rings between two levels, from left to right.
func spanning(rings []ring, y0, y1 float64) []edge {
	mid := (y0 + y1) / 2
	var out []edge
	for _, r := range rings {
		for i, a := range r {
			b := r[(i+1)%len(r)]
			if a.y > b.y {
				a, b = b, a
			}
			if a.y > mid || b.y <= mid {
				continue
			}
			at := func(y float64) float64 { return a.x + (b.x-a.x)*(y-a.y)/(b.y-a.y) }
			out = append(out, edge{at(y0), at(y1)})
		}
	}
	slices.SortFunc(out, func(a, b edge) int { return cmp.Compare(a.x0+a.x1, b.x0+b.x1) })
	return out
}

// measure builds a shape from its lines. Concrete lies between every odd edge
// and the next: hollows are inside the outline.
func measure(outer ring, voids []ring) *shape {
	top, bottom := math.Inf(1), math.Inf(-1)
	for _, c := range outer {
		top, bottom = math.Min(top, c.y), math.Max(bottom, c.y)
	}
	rings := append([]ring{outer}, voids...)
	var levels []float64
	for _, r := range rings {
		for i := range r {
			r[i].y -= top
			levels = append(levels, r[i].y)
		}
	}
	slices.Sort(levels)
	s := &shape{outer: outer, h: bottom - top, bw: math.Inf(1), flange: -1}
	left, right := math.Inf(-1), math.Inf(1)
	moment := 0.0
	for i := 1; i < len(levels); i++ {
		y0, y1 := levels[i-1], levels[i]
		if y1-y0 <= 1e-9*s.h {
			continue
		}
		b := band{y0: y0, y1: y1}
		for k, e := range spanning(rings, y0, y1) {
			sign := float64(2*(k%2) - 1)
			b.w0, b.w1 = b.w0+sign*e.x0, b.w1+sign*e.x1
		}
		if sides := spanning(rings[:1], y0, y1); len(sides) > 1 {
			a, z := sides[0], sides[len(sides)-1]
			left, right = math.Max(left, math.Max(a.x0, a.x1)), math.Min(right, math.Min(z.x0, z.x1))
		}
		s.bands = append(s.bands, b)
		s.bw = math.Min(s.bw, math.Min(b.w0, b.w1))
		s.gross += b.area()
		moment += b.moment()
	}
	s.centroid = moment / s.gross
	s.strip = right - left
	s.bw = math.Min(s.bw, s.strip)
	s.faces = [2]float64{s.bands[len(s.bands)-1].w1, s.bands[0].w0}
	s.enclosed = s.gross
	for i, a := range outer {
		b := outer[(i+1)%len(outer)]
		s.perimeter += math.Hypot(b.x-a.x, b.y-a.y)
	}
	s.side, s.above, s.low = math.Inf(1), math.Inf(1), math.Inf(1)
	for _, v := range voids {
		s.hollow = true
		twice := 0.0
		for i, a := range v {
			b := v[(i+1)%len(v)]
			twice += a.x*b.y - b.x*a.y
			s.side = math.Min(s.side, math.Min(a.x-left, right-a.x))
			s.above, s.low = math.Min(s.above, a.y), math.Min(s.low, s.h-a.y)
		}
		s.enclosed += math.Abs(twice) / 2
	}
	return s
}

// shapeOf measures the section of a brief.
func (p *printed) shapeOf(b *beam.Brief) *shape {
	clear := 0.0
	if len(b.Spans) == 1 && len(b.Supports) == 2 {
		clear = p.length(b.Spans[0]) - (p.length(b.Supports[0].Width)+p.length(b.Supports[1].Width))/2
	}
	outer, voids, over := p.outlineOf(&b.Section, clear)
	s := measure(outer, voids)
	s.over = over
	if over[0]+over[1] > 0 {
		s.thick = p.length(b.Section.FlangeThickness)
		s.flange = 1
		if b.Section.Shape == beam.InvertedTee {
			s.flange = 0
		}
	}
	return s
}

// pressed is the concrete within a depth of a face (0 bottom, 1 top): its area
// and where its centre is, counted from that face.
func (s *shape) pressed(face int, depth float64) (area, centre float64) {
	moment := 0.0
	for i := range s.bands {
		b := s.bands[i]
		if face == 0 {
			b = s.bands[len(s.bands)-1-i]
			b = band{s.h - b.y1, s.h - b.y0, b.w1, b.w0}
		}
		if b.y0 >= depth {
			break
		}
		if b.y1 > depth {
			b.w1 = b.w0 + (b.w1-b.w0)*(depth-b.y0)/(b.y1-b.y0)
			b.y1 = depth
		}
		area, moment = area+b.area(), moment+b.moment()
	}
	if area == 0 {
		return 0, 0
	}
	return area, moment / area
}
