package rederive

import (
	"math"

	"soffit.example/beam"
	"soffit.example/units"
)

// twist is a section as 22.7 sees it, whatever its bars.
type twist struct {
	acp, pcp float64
	flange   bool // counts in both
	hollow   bool
	ag       float64
	lr       float64
	cot      float64
	fy, fyt  float64 // both no more than Grade 60
}

// twisting prepares the section. A flange counts over the lesser of the
// projection of the beam below or above the slab, four times its thickness and
// itself (9.2.4.4), unless the section has the larger Acp2/pcp without.
func (j *judge) twisting() *twist {
	s := j.s
	t := &twist{
		lr: j.lambda * math.Min(math.Sqrt(j.fc), j.rootMost), ag: s.gross,
		fy: math.Min(j.fy, j.fytMost), fyt: j.fyt, cot: 1,
	}
	if a := j.b.Readings.TorsionAngle; a != 0 {
		t.cot = 1 / math.Tan(a*math.Pi/180)
	}
	t.acp, t.pcp = j.bw*j.h, 2*(j.bw+j.h)
	acp, pcp := s.enclosed, s.perimeter
	if j.b.Section.Shape == beam.Polygon {
		acp, pcp = j.withinOverhangs(acp, pcp)
	}
	if s.flange >= 0 {
		acp, pcp = t.acp, t.pcp
		for _, o := range s.over {
			o = math.Min(o, math.Min(j.h-s.thick, 4*s.thick))
			acp, pcp = acp+o*s.thick, pcp+2*o
		}
	}
	if acp*acp/pcp >= t.acp*t.acp/t.pcp {
		t.acp, t.pcp, t.flange = acp, pcp, true
	}
	t.hollow = s.hollow && s.gross < 0.95*t.acp*(1-1e-9)
	return t
}

// axial is the factor for an axial force, compression positive.
func (j *judge) axial(nu float64) float64 {
	return math.Sqrt(math.Max(0, 1+nu/(j.tAxial*j.twist.ag*j.twist.lr)))
}

func (j *judge) threshold(nu float64) float64 {
	t := j.twist
	area := t.acp
	if t.hollow {
		area = t.ag
	}
	return j.tth * t.lr * area * area / t.pcp * j.axial(nu)
}

func (j *judge) cracking22(nu float64) float64 {
	return j.tcr * j.twist.lr * j.twist.acp * j.twist.acp / j.twist.pcp * j.axial(nu)
}

// phiTorsion is that of 21.2.1.
const phiTorsion = 0.75

// designTorque is what of a torque must be designed for (22.7.3): all of it up
// to cracking; beyond, what compatibility does not impose, and never less than
// the cracking torque. Zero: it may be neglected.
func (j *judge) designTorque(all, shed, nu float64) float64 {
	most := math.Abs(all)
	if most < phiTorsion*j.threshold(nu)*(1+slack) {
		return 0
	}
	needed := math.Abs(all - shed)
	cracking := phiTorsion * j.cracking22(nu)
	switch {
	case most <= cracking:
		return most
	case (all-shed)*shed < 0:
		return math.Max(most, needed)
	}
	return math.Max(cracking, needed)
}

// twisted reports whether some torque must be designed for.
func (j *judge) twisted() bool {
	if j.twist == nil {
		return false
	}
	for i := range j.b.Demands {
		d := &j.b.Demands[i]
		if j.designTorque(j.moment(d.Torque), 0, j.force(d.Axial)) > 0 {
			return true
		}
	}
	if j.member == nil || len(j.member.torques) == 0 {
		return false
	}
	for _, s := range j.all {
		if s.x < j.member.faceL || s.x > j.member.faceR {
			continue
		}
		if all, shed := j.member.twisting(&j.member.combos[s.combo], s.x, s.right); j.designTorque(all, shed, 0) > 0 {
			return true
		}
	}
	return false
}

// twistedAt is a section that needs torsion steel.
type twistedAt struct {
	x       float64 // where it is
	m, nu   float64
	v, mv   float64 // shear, and the moment with it, at the critical section
	t, face float64 // to design for: as read d from the face, and where it is
}

// torsions lists the sections that need torsion steel.
func (j *judge) torsions() []twistedAt {
	var out []twistedAt
	if j.member == nil {
		for i := range j.b.Demands {
			d := &j.b.Demands[i]
			all, shed, nu := j.moment(d.Torque), 0.0, j.force(d.Axial)
			if d.Path == beam.CompatibilityTorque {
				shed = all
			}
			if t := j.designTorque(all, shed, nu); t > 0 {
				m := j.moment(d.Moment)
				out = append(out, twistedAt{m: m, nu: nu, v: j.force(d.Shear), mv: m, t: t, face: t})
			}
		}
		return out
	}
	m := j.member
	if len(m.torques) == 0 {
		return nil
	}
	twist, shear := make([][2]float64, len(m.combos)), make([][2]float64, len(m.combos))
	for i := range m.combos {
		twist[i], shear[i] = j.twistCritical(&m.combos[i]), j.critical(&m.combos[i])
	}
	clamp := func(x float64, right bool, to [2]float64) (float64, bool) {
		switch {
		case x < to[0]:
			return to[0], true
		case x > to[1]:
			return to[1], false
		}
		return x, right
	}
	for _, s := range j.all {
		if s.x < m.faceL || s.x > m.faceR || s.x == m.faceL && !s.right || s.x == m.faceR && s.right {
			continue
		}
		c := &m.combos[s.combo]
		x, right := clamp(s.x, s.right, twist[s.combo])
		all, shed := m.twisting(c, x, right)
		t := j.designTorque(all, shed, 0)
		face := t
		if x != s.x {
			// The torque at d may be used for the sections nearer the face; where
			// it is less than theirs.
			all, shed := m.twisting(c, s.x, s.right)
			face = j.designTorque(all, shed, 0)
			t = math.Min(t, face)
		}
		if t == 0 {
			continue
		}
		at := twistedAt{x: s.x, m: s.m, v: s.v, mv: s.m, t: t, face: face}
		if x, right := clamp(s.x, s.right, shear[s.combo]); x != s.x {
			at.mv, at.v = m.at(c, x, right)
		}
		out = append(out, at)
	}
	return out
}

// torsion judges the section and the steel of every section that needs it.
func (j *judge) torsion() {
	all := j.torsions()
	if len(all) == 0 {
		return
	}
	t := j.twist
	x1, y1 := j.bw-2*j.cover-j.dst, j.h-2*j.cover-j.dst
	if len(j.zones) == 0 || x1 <= 0 || y1 <= 0 {
		j.wrong("torsion.transverse", math.Inf(1), "no closed stirrups")
		return
	}
	aoh, ph := x1*y1, 2*(x1+y1)
	ao := 0.85 * aoh
	reach := math.Inf(1) // bt + d
	for _, b := range j.beds {
		if b.count > 0 {
			reach = math.Min(reach, j.bw-2*j.cover+j.h-b.centroid)
		}
	}
	if t.hollow {
		wall := math.Min(j.s.side, math.Min(j.s.above, j.s.low))
		j.check("torsion.wall", 0.5*aoh/ph, wall-j.cover-j.dst/2, "")
	}
	least := math.Max(j.avRoot*math.Sqrt(j.fc), j.avFloor) * j.s.bw / t.fyt
	sMost := math.Min(ph/8, j.sTwist)
	widest := 0.0
	for i := range all {
		at := &all[i]
		found := false
		for n := range j.zones {
			z := &j.zones[n]
			from, to := z.from-z.s, z.to+z.s
			if j.member != nil && (at.x < z.from-reach || at.x > z.to+reach) {
				continue
			}
			widest = math.Max(widest, z.s)
			if !z.closed {
				j.wrong("torsion.closed", 2, "at %.5g", at.x)
			}
			j.check("torsion.minimum-stirrups", least, z.area/z.s, "at %.5g", at.x)
			j.check("torsion.spacing-along", z.s, sMost, "at %.5g", at.x)
			if j.member != nil && (at.x < from || at.x > to) {
				continue
			}
			if j.member == nil || at.x >= z.from*(1-1e-9) && at.x <= z.to*(1+1e-9) {
				j.together(at, z)
			}
			found = true
		}
		if !found {
			j.wrong("torsion.transverse", math.Inf(1), "no stirrups at %.5g", at.x)
		}
	}
	j.perimeter(widest)
	for i := range all {
		j.alongside(&all[i], x1, y1, ao)
	}
}

// together judges shear and torque on one section and on its outer legs.
func (j *judge) together(at *twistedAt, z *zone) {
	x1, y1 := j.bw-2*j.cover-z.db, j.h-2*j.cover-z.db
	aoh, ph := x1*y1, 2*(x1+y1)
	ao := 0.85 * aoh
	section, outer := math.Inf(1), math.Inf(1)
	t := j.twist
	for k, w := range j.webs(z) {
		if w == nil || at.mv > 1e-9*j.scale && k == 1 || at.mv < -1e-9*j.scale && k == 0 {
			continue
		}
		bd := w.bw * w.d
		v := math.Abs(at.v)
		vc := w.concrete(v, math.Abs(at.mv), at.nu, w.enough)
		shear, twisting := v/bd, at.t*ph/(1.7*aoh*aoh)
		asked := math.Hypot(shear, twisting)
		if t.hollow {
			// The walls above and below the hollow bear the torque alone: the sum
			// is asked for where it is greatest (22.7.7.1.2).
			flow := func(wall float64) float64 {
				if wall < aoh/ph {
					return at.t / (1.7 * aoh * wall)
				}
				return twisting
			}
			asked = math.Max(shear+flow(j.s.side), flow(math.Min(j.s.above, j.s.low)))
		}
		section = math.Min(section, asked/(phiTorsion*(vc/bd+j.v8*math.Sqrt(j.fc))))
		avs := 0.0
		if needed := v/phiTorsion - vc - j.bentUp(w, at.x, at.v); needed > 0 {
			avs = needed / (j.fyt * w.d)
			if z.angle < math.Pi/2 {
				avs /= math.Sin(z.angle) + math.Cos(z.angle)
			}
		}
		ats := at.t / (2 * phiTorsion * ao * t.fyt * t.cot)
		one := z.area / float64(z.legs) / z.s
		outer = math.Min(outer, (avs/float64(z.legs)+ats)/one)
	}
	if math.IsInf(section, 1) {
		return
	}
	j.check("torsion.section", section, 1, "at %.5g, Vu %.5g, Tu %.5g", at.x, at.v, at.t)
	j.check("torsion.transverse", outer, 1, "at %.5g, Vu %.5g, Tu %.5g", at.x, at.v, at.t)
}

// perimeter judges where the longitudinal bars lie round the stirrup.
func (j *judge) perimeter(s float64) {
	least := math.Inf(1)
	var ys []float64
	for k, b := range j.beds {
		if b.count == 0 || len(b.layers[0]) < 2 {
			j.wrong("torsion.corners", 2, "face %d", k)
			continue
		}
		row := b.layers[0]
		least = math.Min(least, math.Min(2*row[0].real(), 2*row[len(row)-1].real()))
		for i := 1; i < len(row); i++ {
			j.check("torsion.longitudinal-spacing", row[i].x-row[i-1].x, j.round, "face %d", k)
		}
		for _, row := range b.layers {
			if len(row) > 1 {
				y := row[0].y
				if k == 1 {
					y = j.h - y
				}
				ys = append(ys, y)
			}
		}
	}
	heights, _ := j.sideBars()
	ys = append(ys, heights...)
	if len(heights) > 0 {
		for i := range j.l.Longitudinal {
			if r := &j.l.Longitudinal[i]; r.Face == beam.Side {
				if size, err := j.catalog.Size(r.Bar); err == nil {
					least = math.Min(least, j.length(size.Diameter))
				}
			}
		}
	}
	for _, y := range ys {
		next := math.Inf(1)
		for _, o := range ys {
			if o > y*(1+1e-9) {
				next = math.Min(next, o)
			}
		}
		if !math.IsInf(next, 1) {
			j.check(SideSpacing, next-y, j.round, "at the side, from %.5g", y)
		}
	}
	// Printed diameters of No. 3 and No. 10 bars are the limit itself, 9.5 mm
	// for 10 mm.
	if j.us || s*0.042 > j.thin {
		j.check("torsion.bar-diameter", math.Max(0.042*s, math.Min(j.thin, least)), least, "at a spacing of %.5g", s)
	}
}

// alongside judges the longitudinal steel at a section, face by face
// (9.5.4.3, 9.5.4.5, 9.6.4.3). Less torque may ask for more of the least steel,
// so that near a support the torque there will do as well as that at d.
func (j *judge) alongside(at *twistedAt, x1, y1, ao float64) {
	t := j.twist
	ph := 2 * (x1 + y1)
	of := func(torque float64) (al, least float64) {
		ats := torque / (2 * phiTorsion * ao * t.fyt * t.cot)
		least = math.Max(0, j.al*math.Sqrt(j.fc)*t.acp/t.fy-math.Max(ats, j.alFloor*j.s.bw/t.fyt)*ph*t.fyt/t.fy)
		return math.Max(ats*ph*t.fyt/t.fy*t.cot*t.cot, least), least
	}
	al, least := of(at.t)
	if a, l := of(at.face); a < al {
		al, least = a, l
	}
	heights, area := j.sideBars()
	// Spread evenly round the stirrup, with bars no further apart than the limit:
	// those in the corners take half a part of each side.
	parts := math.Max(1, math.Ceil(y1/j.round-1e-9))
	across, side := (x1+y1/parts)/ph, y1/ph*(1-1/parts)
	for k, b := range j.beds {
		id := "torsion.longitudinal." + [2]string{"bottom", "top"}[k]
		if b.count == 0 {
			j.wrong(id, math.Inf(1), "no bars")
			continue
		}
		share := across * al
		bends := at.m
		if k == 1 {
			bends = -bends
		}
		need := share
		switch {
		case bends > 1e-9*j.scale:
			need += j.requiredShare(k, bends, at.nu, share/b.area) * b.area
		case bends < -1e-9*j.scale && j.beds[1-k].count > 0:
			d := j.h - j.beds[1-k].centroid
			need = math.Max(share+bends/(0.9*d*t.fy), across*least)
		}
		j.check(id, need, b.area, "at %.5g, Mu %.5g, Tu %.5g", at.x, at.m, at.t)
	}
	j.check("torsion.longitudinal.side", side*al, float64(len(heights))*area, "at %.5g, Tu %.5g", at.x, at.t)
}

// shares is the number of shares of the steel of a face whose strength is
// found once.
const shares = 24

// requiredShare is the share of the tension steel of a face that a moment
// needs: close to one together with the rest that is asked of it, sharply, and
// otherwise between shares whose strength is known.
func (j *judge) requiredShare(k int, m, nu, rest float64) float64 {
	f := j.fibres(k)
	carried := func(q, nu float64) float64 {
		s := f.design(j.steel(k, q, true), nu)
		if !s.ok {
			return 0
		}
		return s.phi * s.mn
	}
	low, high := 0.0, 1.0
	if nu == 0 {
		if j.required[k] == nil {
			j.required[k] = make([]float64, shares+1)
			for i := 1; i <= shares; i++ {
				j.required[k][i] = carried(float64(i)/shares, 0)
			}
		}
		i := 1
		for i <= shares && j.required[k][i] < m {
			i++
		}
		if i > shares {
			return 1 // what flexure itself finds wrong
		}
		low, high = float64(i-1)/shares, float64(i)/shares
		between := low + (high-low)*(m-j.required[k][i-1])/(j.required[k][i]-j.required[k][i-1])
		if math.Abs(between+rest-1) > 0.02 {
			return between
		}
	} else if carried(1, nu) < m {
		return 1
	}
	for range 18 {
		mid := (low + high) / 2
		if carried(mid, nu) < m {
			low = mid
		} else {
			high = mid
		}
	}
	return low
}

// withinOverhangs cuts a polygon's overhangs off where they count no further
// (9.2.4.4): those thinner than half the depth are flanges, of which the lesser
// of four thicknesses and the projection of the rest counts. The cutting itself
// is elementary geometry, tested where it stands.
func (j *judge) withinOverhangs(acp, pcp float64) (area, perimeter float64) {
	section := j.b.Section
	g, faults := beam.GeometryOf(&section)
	if len(faults) > 0 {
		return acp, pcp
	}
	h := section.Depth
	var out [2]units.Length
	for i, thick := range g.OverhangThickness {
		out[i] = g.Overall
		if thick.Less(h.Scale(0.5)) {
			out[i] = thick.Scale(4).Min(h.Sub(thick))
		}
	}
	a, p := section.Clipped(&g, out[0], out[1])
	one := j.length(units.Metre.Of(1))
	return a.In(units.SquareMetre) * one * one, p.In(units.Metre) * one
}
