package rederive

import (
	"math"

	"soffit.example/beam"
	"soffit.example/beam/statics"
)

// scope finds what the sectional method does not cover.
func (j *judge) scope() {
	if j.fc < j.fcLeast*(1-slack) {
		j.outOfScope("f'c of %g", j.fc)
	}
	if j.fy < j.fyLeast*(1-slack) || j.fy > j.fyMost*(1+slack) {
		j.outOfScope("fy of %g", j.fy)
	}
	if j.b.Reinforcement.Catalog != "astm-inch" && j.b.Reinforcement.Catalog != "astm-metric" {
		j.outOfScope("catalog %s", j.b.Reinforcement.Catalog)
	}
	for i := range j.b.Demands {
		d := &j.b.Demands[i]
		if n := j.force(d.Axial); n >= 0.1*j.fc*j.s.gross*(1+slack) {
			j.outOfScope("axial force of %g", n)
		}
	}
	if j.member == nil {
		return
	}
	m := j.member
	clear, times := m.faceR-m.faceL, 4.0
	if m.left == statics.Free || m.right == statics.Free {
		times = 2 // of a cantilever: half of a span between supports
	}
	if clear <= times*j.h*(1-slack) {
		j.outOfScope("deep: %g of clear span on %g of depth", clear, j.h)
	}
	for i := range j.b.Loads {
		l := &j.b.Loads[i]
		if l.Shape != beam.PointLoad || l.Force.IsZero() || l.Hung {
			continue
		}
		at := j.length(l.At)
		for end, from := range [2]float64{at - m.faceL, m.faceR - at} {
			s := &j.b.Supports[end]
			if s.Kind != statics.Free && !s.Hung && from > 1e-9*m.length && from <= 2*j.h*(1-slack) {
				j.outOfScope("a concentrated load %g from a face", from)
			}
		}
	}
}

// whole judges the limits of the member as such.
func (j *judge) whole() {
	if !j.b.Braced.IsZero() {
		least := math.Inf(1)
		for k := range j.bent {
			if j.bent[k] {
				least = math.Min(least, j.s.faces[1-k])
			}
		}
		j.check("bracing.spacing", j.length(j.b.Braced), 50*least, "")
	}
	if j.member == nil {
		return
	}
	m := j.member
	l, over := m.length, 16.0
	fixed := 0
	for _, s := range [2]statics.SupportKind{m.left, m.right} {
		if s == statics.Fixed {
			fixed++
		}
	}
	switch {
	case m.left == statics.Free || m.right == statics.Free:
		l, over = m.faceR-m.faceL, 8
	case fixed == 2:
		over = 21
	case fixed == 1:
		over = 18.5
	}
	least := l / over * (0.4 + j.fy/j.depthFy)
	if j.b.Concrete.Kind > beam.Normalweight {
		if wc := j.unitWeight(j.b.Concrete.Density); wc >= j.lightLow && wc <= j.lightHigh {
			least *= math.Max(j.light-j.lightSlope*wc, j.lightMost)
		}
	}
	j.check("depth.minimum", least, j.h, "")
}

// ribs judges the limits of a joist floor (9.8.1), but for those of the slab
// that the brief does not tell.
func (j *judge) ribs() {
	if !j.b.Section.Joist {
		return
	}
	j.check("joist.width", j.rib, j.s.bw, "9.8.1.2")
	j.check("joist.depth", j.h-j.length(j.b.Section.FlangeThickness), 3.5*j.s.bw, "9.8.1.3")
	for _, clear := range [2]float64{j.length(j.b.Section.Slab.ClearLeft), j.length(j.b.Section.Slab.ClearRight)} {
		if clear > 0 {
			j.check("joist.spacing", clear, j.ribClear, "9.8.1.4")
		}
	}
}

// sides judges the bars along the side faces of deep beams (9.7.2.3).
func (j *judge) sides() {
	if j.h <= j.deep*(1+slack) || j.s.flange < 0 && j.s.enclosed > j.bw*j.h*(1+slack) {
		return // or a face that is not that of the strip, whose cover changes with the level
	}
	limit := j.crack(j.cover+j.dst, j.fy)
	for k := range j.beds {
		if !j.bent[k] || j.beds[k].count == 0 {
			continue
		}
		var heights []float64 // of bars along the side, from the face in tension
		for _, row := range j.beds[k].layers {
			if len(row) > 1 { // a single bar lies in the middle of the width
				heights = append(heights, row[0].y)
			}
		}
		beside, _ := j.sideBars()
		for _, y := range beside {
			if y >= j.h {
				j.wrong(SideFace, 2, "a bar at %.5g lies outside the beam", y)
			}
			if k == 1 {
				y = j.h - y
			}
			heights = append(heights, y)
		}
		at := j.beds[k].nearest
		for at < j.h/2 {
			next := math.Inf(1)
			for _, y := range heights {
				if y > at*(1+1e-9) {
					next = math.Min(next, y)
				}
			}
			if math.Min(next, j.h/2)-at > limit*(1+slack) {
				j.wrong(SideFace, (math.Min(next, j.h/2)-at)/limit, "sense %d: from %.5g to %.5g", k, at, next)
				break
			}
			at = next
		}
	}
}
