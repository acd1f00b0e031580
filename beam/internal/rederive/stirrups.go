package rederive

import (
	"math"

	"soffit.example/beam"
	"soffit.example/beam/statics"
)

// webOf prepares a section for one sense of bending and one zone; nil: none.
func (j *judge) webOf(k int, z *zone) (*web, bool) {
	b := j.beds[k]
	if b.count == 0 {
		return nil, false
	}
	w := &web{
		p: j.printed, fc: j.fc, lambda: j.lambda, bw: j.s.bw, h: j.h, d: j.h - b.centroid, as: b.area, ag: j.s.gross, fyt: j.fyt,
		joist: j.b.Section.Joist, fibres: j.b.Concrete.Fibres && j.lambda == 1 && j.fc <= j.fcFibre*(1+1e-9),
		detailed: j.b.Readings.ShearMethod == beam.DetailedShear,
		rowA:     j.b.Readings.ShearRow == beam.RowA, rowB: j.b.Readings.ShearRow == beam.RowB,
	}
	if s := &j.b.Section; (s.Shape == beam.Tee || s.Shape == beam.Ell) && !s.Isolated {
		w.integral = math.Min(math.Max(2.5*j.length(s.FlangeThickness), 0.5*j.s.bw), j.shallowT)
	}
	if z != nil && z.angle >= math.Pi/4*(1-1e-9) { // flatter ones are none
		w.av, w.s, w.angle = z.area, z.s, z.angle
		w.across = (j.bw - 2*j.cover - z.db) / float64(z.legs-1)
	}
	w.prepare()
	return w, true
}

// worst gathers the largest utilizations of a zone.
type worst struct {
	shearing
	x, v float64
}

func (w *worst) take(s shearing, x, v float64) {
	if s.strength > w.strength {
		w.x, w.v = x, v
	}
	w.strength, w.limit = math.Max(w.strength, s.strength), math.Max(w.limit, s.limit)
	w.least, w.along, w.across = math.Max(w.least, s.least), math.Max(w.along, s.along), math.Max(w.across, s.across)
}

// lesser is the more lenient of two.
func lesser(a, b shearing) shearing {
	return shearing{
		math.Min(a.strength, b.strength), math.Min(a.limit, b.limit), math.Min(a.least, b.least),
		math.Min(a.along, b.along), math.Min(a.across, b.across),
	}
}

// sectionShear judges a section by the sense of its moment; where it has none,
// by the sense that asks less of those that bend the beam at all.
func (j *judge) sectionShear(webs [2]*web, x, m, v, nu float64) (shearing, bool) {
	for _, w := range webs {
		if w != nil {
			w.bent = j.bentUp(w, x, v)
		}
	}
	tiny := 1e-9 * j.scale
	if k := 0; m > tiny || m < -tiny {
		if m < 0 {
			k = 1
		}
		if webs[k] == nil {
			return shearing{}, false
		}
		return webs[k].at(v, m, nu), true
	}
	var out shearing
	found := false
	for k, w := range webs {
		if w == nil || !j.bent[k] && j.bent[1-k] {
			continue
		}
		s := w.at(v, 0, nu)
		if found {
			s = lesser(out, s)
		}
		out, found = s, true
	}
	return out, found
}

func (j *judge) webs(z *zone) (webs [2]*web) {
	for k := range webs {
		if w, ok := j.webOf(k, z); ok {
			webs[k] = w
		}
	}
	return webs
}

func (j *judge) reportShear(w *worst, where string) {
	j.check("shear.strength", w.strength, 1, "%s: at %.5g, Vu %.5g", where, w.x, w.v)
	j.check("shear.section-limit", w.limit, 1, "%s: at %.5g", where, w.x)
	j.check("shear.minimum-stirrups", w.least, 1, "%s", where)
	j.check("shear.spacing-along", w.along, 1, "%s", where)
	j.check("shear.spacing-across", w.across, 1, "%s", where)
}

// shear judges the stirrups of every zone and the lengths between them.
func (j *judge) shear() {
	for i := range j.zones {
		j.hooks(&j.zones[i])
	}
	if j.member == nil {
		var z *zone
		if len(j.zones) > 0 {
			z = &j.zones[0]
		}
		webs := j.webs(z)
		var w worst
		for i := range j.b.Demands {
			d := &j.b.Demands[i]
			v := j.force(d.Shear)
			if s, ok := j.sectionShear(webs, 0, j.moment(d.Moment), v, j.force(d.Axial)); ok {
				w.take(s, float64(i), v)
			}
		}
		j.reportShear(&w, "demands")
		return
	}
	m := j.member
	for i := range j.zones {
		z := &j.zones[i]
		j.stretch(z, math.Max(z.from, m.faceL), math.Min(z.to, m.faceR), "zone")
	}
	at := m.faceL
	for at < m.faceR-1e-9*m.length {
		end, covered := m.faceR, false
		for i := range j.zones {
			z := &j.zones[i]
			switch {
			case z.from <= at+1e-9*m.length && z.to > at+1e-9*m.length:
				if !covered {
					end = z.to
				}
				covered, end = true, math.Max(end, z.to)
			case z.from > at && !covered:
				end = math.Min(end, z.from)
			}
		}
		if !covered {
			j.between(at, end)
		}
		at = end
	}
}

// between judges a length that no zone reaches. The first stirrup of a zone
// stands half a spacing inside it and the last one as far from its end: what
// counts is how far the stirrups on either side are apart.
func (j *judge) between(at, end float64) {
	m := j.member
	tiny := 1e-9 * m.length
	var left, right *zone
	for i := range j.zones {
		z := &j.zones[i]
		if math.Abs(z.to-at) <= tiny {
			left = z
		}
		if math.Abs(z.from-end) <= tiny {
			right = z
		}
	}
	if left == nil || right == nil {
		for _, z := range [2]*zone{left, right} {
			if z != nil && end-at <= z.s/2*(1+slack) {
				return // the stirrup nearest the face is within a spacing of it
			}
		}
		j.stretch(nil, at, end, "no stirrups")
		return
	}
	apart, widest := left.s/2+end-at+right.s/2, math.Max(left.s, right.s)
	switch {
	case apart <= widest*(1+slack):
	case apart <= 2*widest*(1+slack):
		z := *left
		if right.area < z.area {
			z = *right
		}
		z.s = apart
		j.stretch(&z, at, end, "between zones")
	default:
		j.stretch(nil, at, end, "no stirrups")
	}
}

// Enough tells of places along the span, in metres, whether the stirrups of
// the first zone of a layout would do for shear there, wherever the zone
// itself lies. It is nil where the brief has no span.
func (b *Beam) Enough(l beam.Layout) (at []float64, ok []bool, err error) {
	j, err := b.with(&l)
	if err != nil || j.member == nil {
		return nil, nil, err
	}
	m := j.member
	webs := j.webs(&j.zones[0])
	unit := 0.001
	if j.us {
		unit = 0.0254
	}
	for _, s := range j.all {
		if s.x < m.faceL || s.x > m.faceR {
			continue
		}
		c := j.critical(&m.combos[s.combo])
		x := math.Max(c[0], math.Min(c[1], s.x))
		a, v := s.m, s.v
		if x != s.x {
			a, v = m.at(&m.combos[s.combo], x, x > s.x)
		}
		fits, found := j.sectionShear(webs, x, a, v, 0)
		well := !found || fits.most() <= 1+slack
		if n := len(at); n > 0 && at[n-1] == s.x*unit {
			ok[n-1] = ok[n-1] && well
			continue
		}
		at, ok = append(at, s.x*unit), append(ok, well)
	}
	return at, ok, nil
}

// stretch judges a length with like stirrups, or without any.
func (j *judge) stretch(z *zone, from, to float64, where string) {
	m := j.member
	if from >= to {
		return
	}
	webs := j.webs(z)
	critical := make([][2]float64, len(m.combos))
	for i := range m.combos {
		critical[i] = j.critical(&m.combos[i])
	}
	var w worst
	one := func(a, b, x float64) {
		if s, ok := j.sectionShear(webs, x, a, b, 0); ok {
			w.take(s, x, b)
		}
	}
	for i := range m.combos {
		low := math.Max(critical[i][0], math.Min(critical[i][1], from))
		high := math.Max(critical[i][0], math.Min(critical[i][1], to))
		a, b := m.at(&m.combos[i], low, true)
		one(a, b, low)
		a, b = m.at(&m.combos[i], high, false)
		one(a, b, high)
	}
	for _, s := range j.all {
		c := critical[s.combo]
		low, high := math.Max(from, c[0]), math.Min(to, c[1])
		if s.x > low && s.x < high {
			one(s.m, s.v, s.x)
		}
	}
	j.reportShear(&w, where)
}

// critical are the sections of a combination beyond which the shear need not
// be followed to the faces (9.4.3.2).
func (j *judge) critical(c *combo) [2]float64 {
	for i := range j.b.Loads {
		if j.b.Loads[i].Hung {
			return [2]float64{j.member.faceL, j.member.faceR}
		}
	}
	return j.beyond(c, func(end int, inward, d float64) bool {
		m := j.member
		face := [2]float64{m.faceL, m.faceR}[end]
		if _, v := m.at(c, face, end == 0); j.b.Supports[end].Hung || v*inward < 0 {
			return false // the reaction pulls
		}
		for i := range j.b.Loads {
			l := &j.b.Loads[i]
			if l.Shape != beam.PointLoad || l.Force.IsZero() {
				continue
			}
			if from := (j.length(l.At) - face) * inward; from > 1e-9*m.length && from < d*(1-1e-9) {
				return false
			}
		}
		return true
	})
}

// twistCritical are those beyond which the torque need not be (9.4.4.3).
func (j *judge) twistCritical(c *combo) [2]float64 {
	return j.beyond(c, func(end int, inward, d float64) bool {
		m := j.member
		face := [2]float64{m.faceL, m.faceR}[end]
		for _, t := range m.torques {
			if from := (t.at - face) * inward; !t.spread && from > 1e-9*m.length && from < d*(1-1e-9) {
				return false
			}
		}
		return true
	})
}

// beyond goes d from each face that holds where a rule lets it.
func (j *judge) beyond(c *combo, lets func(end int, inward, d float64) bool) [2]float64 {
	m := j.member
	faces := [2]float64{m.faceL, m.faceR}
	out := faces
	for end := range out {
		inward := float64(1 - 2*end)
		if [2]statics.SupportKind{m.left, m.right}[end] == statics.Free {
			continue
		}
		// d of the senses that this combination shows near the face.
		d := 0.0
		for n := 1; n <= 8; n++ {
			x := faces[end] + inward*j.h*float64(n)/8
			if x < 0 || x > m.length {
				break
			}
			a, _ := m.at(c, x, end == 0)
			k := 0
			if a < 0 {
				k = 1
			}
			if j.beds[k].count > 0 {
				d = math.Max(d, j.h-j.beds[k].centroid)
			}
		}
		if lets(end, inward, d) {
			out[end] = faces[end] + inward*d
		}
	}
	if out[0] >= out[1] {
		return faces
	}
	return out
}

// hooks judges whether a stirrup is developed (25.7.1.3).
func (j *judge) hooks(z *zone) {
	if z.number <= 5 || j.fyt <= j.hookYield*(1+slack) {
		return
	}
	need := j.hook * z.db * j.fyt / (j.lambda * math.Min(math.Sqrt(j.fc), j.rootMost))
	j.check("shear.stirrup-anchorage", need, j.h/2-j.cover, "number %d", z.number)
}

// ties judges the stirrups round bars relied on in compression (9.7.6.4).
func (j *judge) ties() {
	for k, b := range j.beds {
		if !b.relied || b.count == 0 || !j.bent[1-k] {
			continue
		}
		if len(j.zones) == 0 {
			j.wrong("ties.spacing", math.Inf(1), "none")
			continue
		}
		smallest, largest := math.Inf(1), 0
		for _, row := range b.layers {
			for _, o := range row {
				smallest, largest = math.Min(smallest, 2*o.real()), max(largest, o.number)
			}
		}
		for i := range j.zones {
			z := &j.zones[i]
			if z.number < 3 || largest > 10 && z.number < 4 {
				j.wrong("ties.size", 2, "number %d round %d", z.number, largest)
			}
			if !z.closed {
				j.wrong("ties.form", 2, "open")
			}
			j.check("ties.spacing", z.s, math.Min(math.Min(16*smallest, 48*z.db), math.Min(j.bw, j.h)), "zone %d", i)
			outer := b.layers[0]
			if n := len(outer); n > 2 {
				j.check("ties.held-bars", float64(2+(n-2)/2), float64(z.legs), "%d bars", n)
				if n > z.legs {
					clear := 0.0
					for a := 1; a < n; a++ {
						clear = math.Max(clear, outer[a].x-outer[a-1].x-outer[a].r-outer[a-1].r)
					}
					j.check("ties.held-bars", clear, j.tieGap, "%d bars", n)
				}
			}
		}
	}
}

// bentUp is Vs of the bars bent across the web at a place, if they slope
// against the shear (22.5.8.6): three quarters of the slope count.
func (j *judge) bentUp(w *web, x, v float64) (vs float64) {
	for i := range j.l.Bent {
		b := &j.l.Bent[i]
		if b.Angle < 30*(1-1e-9) || (b.Rises == "left") != (v > 0) {
			continue
		}
		size, err := j.catalog.Size(b.Bar)
		if err != nil {
			continue
		}
		sin, cos := math.Sincos(b.Angle * math.Pi / 180)
		reach := 0.75 * (j.h - 2*j.cage.inner) * cos / sin / 2
		at, area, fy := j.length(b.At), j.area(size.Area)*float64(b.Count), math.Min(j.fy, j.fytMost)
		if s := j.length(b.Spacing); b.Bends > 1 {
			ends := [2]float64{at, at + float64(b.Bends-1)*s}
			if math.Min(ends[0], ends[1])-reach <= x && x <= math.Max(ends[0], ends[1])+reach {
				vs += area * fy * (sin + cos) * w.d / s
			}
			continue
		}
		if math.Abs(x-at) <= reach {
			vs += math.Min(area*fy*sin, j.single*math.Sqrt(j.fc)*w.bw*w.d)
		}
	}
	return vs
}

// hangers judges the stirrups beside loads that hang on the beam: they carry
// such a load to the top of the beam besides what they do for the shear.
func (j *judge) hangers() {
	m := j.member
	if m == nil {
		return
	}
	for i := range j.b.Loads {
		l := &j.b.Loads[i]
		if !l.Hung {
			continue
		}
		for _, s := range j.all {
			f := m.combos[s.combo].factors[l.Case]
			if s.x < m.faceL || s.x > m.faceR || f == 0 {
				continue
			}
			hung := 0.0
			switch at := j.length(l.At); l.Shape {
			case beam.Uniform:
				hung = f * j.intensity(l.Intensity)
			case beam.Partial:
				from, to := j.length(l.From), j.length(l.To)
				if s.x < from || s.x > to {
					continue
				}
				a, b := j.intensity(l.Intensity), j.intensity(l.Intensity)
				if l.Varies {
					b = j.intensity(l.IntensityEnd)
				}
				hung = f * (a + (b-a)*(s.x-from)/(to-from))
			case beam.PointLoad:
				if math.Abs(s.x-at) > j.h/2 {
					continue
				}
				hung = f * j.force(l.Force) / j.h
			}
			if hung <= 0 {
				continue
			}
			av, ratio := 0.0, math.Inf(1)
			for n := range j.zones {
				z := &j.zones[n]
				if s.x < z.from-z.s || s.x > z.to+z.s {
					continue
				}
				av = math.Max(av, z.area/z.s)
				for k, w := range j.webs(z) {
					if w == nil || s.m > 1e-9*j.scale && k == 1 || s.m < -1e-9*j.scale && k == 0 {
						continue
					}
					need := hung / (phiShear * j.fyt)
					if vs := math.Abs(s.v)/phiShear - w.concrete(math.Abs(s.v), math.Abs(s.m), 0, w.enough) - j.bentUp(w, s.x, s.v); vs > 0 {
						if z.angle < math.Pi/2 {
							vs /= math.Sin(z.angle) + math.Cos(z.angle)
						}
						need += vs / (j.fyt * w.d)
					}
					ratio = math.Min(ratio, need/(z.area/z.s))
				}
			}
			if math.IsInf(ratio, 1) && av > 0 {
				continue
			}
			j.check("hanger.stirrups", ratio, 1, "at %.5g: %.5g hung", s.x, hung)
		}
	}
}

// phiShear is that of 21.2.1.
const phiShear = 0.75
