package rederive

import (
	"math"
	"slices"

	"soffit.example/beam"
	"soffit.example/beam/statics"
)

// sense is the last word of a check's id.
var sense = [2]string{"positive", "negative"}

// fibres prepares the section for a sense: 0 sagging, 1 hogging.
func (j *judge) fibres(k int) *fibres {
	g := &j.b.Readings
	return &fibres{p: j.printed, s: j.s, face: 1 - k, fc: j.fc, deduct: !g.IgnoreDisplaced, rounded: g.RoundedYield}
}

// steel lists the layers that bend with a sense: a share of those at the face
// in tension and, if they are relied on, those of the web at the other.
func (j *judge) steel(k int, share float64, compression bool) []steelAt {
	var out []steelAt
	add := func(depth, area, fy float64) {
		for i := range out {
			if s := &out[i]; math.Abs(s.depth-depth) < 1e-9*j.h && s.fy == fy {
				s.area += area
				return
			}
		}
		out = append(out, steelAt{depth, area, fy})
	}
	tension, pressed := j.beds[k], j.beds[1-k]
	for _, row := range tension.layers {
		for _, o := range row {
			add(j.h-o.y, share*o.area, o.fy)
		}
	}
	for _, o := range tension.beside {
		add(j.h-o.y, share*o.area, o.fy)
	}
	if compression && pressed.relied {
		for _, row := range pressed.layers {
			for _, o := range row {
				add(o.y, o.area, o.fy)
			}
		}
	}
	if j.b.Readings.CountSideBars && !j.twisted() {
		heights, area := j.sideBars()
		for _, y := range heights {
			if k == 0 {
				y = j.h - y
			}
			add(y, 2*area, j.fy)
		}
	}
	return out
}

// sideBars are the heights of side bars above the soffit, and the area of one
// on each side.
func (j *judge) sideBars() (heights []float64, area float64) {
	last := j.beds[0].nearest // the highest layer at the bottom with bars at the legs
	for _, row := range j.beds[0].layers {
		for _, o := range row {
			if len(row) > 1 {
				last = math.Max(last, o.y)
			}
		}
	}
	for i := range j.l.Longitudinal {
		r := &j.l.Longitudinal[i]
		if r.Face != beam.Side {
			continue
		}
		size, err := j.catalog.Size(r.Bar)
		if err != nil {
			continue
		}
		area = j.area(size.Area)
		for n := 1; n <= r.Count; n++ {
			heights = append(heights, last+float64(n)*j.length(r.Spacing))
		}
	}
	return heights, area
}

// bending judges one sense: 0 sagging, 1 hogging.
func (j *judge) bending(k int) {
	if !j.bent[k] {
		return
	}
	tension := j.beds[k]
	strength, strain, least := "flexure."+sense[k], "flexure.strain."+sense[k], "flexure.minimum."+sense[k]
	if tension.count == 0 {
		j.wrong(strength, math.Inf(1), "no bars at tension face %d", k)
		return
	}
	f := j.fibres(k)
	all := j.steel(k, 1, true)
	for _, d := range j.bendings(k) {
		s := f.design(all, d.nu)
		if !s.ok {
			j.wrong(strength, math.Inf(1), "no equilibrium")
			return
		}
		if d.nu == 0 {
			j.report.Nominal[k] = s.mn
		}
		j.check(strength, d.m, s.phi*s.mn, "Mu %.5g, Nu %.5g, φ %.4g, Mn %.5g", d.m, d.nu, s.phi, s.mn)
		if !j.scattered(k) {
			j.check(strain, s.leastEt, s.strain, "Nu %.5g", d.nu)
		}
	}

	d := j.h - tension.centroid
	fy := 0.0 // the highest of the bars in tension
	for _, o := range tension.layers[0] {
		fy = math.Max(fy, o.fy)
	}
	if j.asCap > 0 {
		fy = math.Min(fy, j.asCap)
	}
	as := math.Max(j.asRoot*math.Sqrt(j.fc), j.asFloor) / fy * j.leastWidth(k) * d
	if u := as / tension.area; u <= 1+slack {
		j.check(least, as, tension.area, "")
	} else {
		// 9.6.1.3: enough if three quarters of the steel would do.
		worst := 0.0
		three := j.steel(k, 0.75, false)
		for _, d := range j.bendings(k) {
			switch q := f.design(three, d.nu); {
			case !q.ok || q.mn <= 0:
				worst = math.Inf(1)
			default:
				worst = math.Max(worst, d.m/(q.phi*q.mn))
			}
		}
		if worst > 1+slack {
			j.wrong(least, u, "%.5g of %.5g", tension.area, as)
		}
	}
	j.cracking(k)
}

// scattered reports whether bars of a flange lie outside the width over which
// its steel is to be spread (24.3.4), where a reading may leave them out.
func (j *judge) scattered(k int) bool {
	beyond := (j.spread(k) - j.bw) / 2
	for _, o := range j.beds[k].beside {
		if o.x < -beyond || o.x > j.bw+beyond {
			return true
		}
	}
	return false
}

// spread is the lesser of the flange and a tenth of the clear span.
func (j *judge) spread(k int) float64 {
	if m := j.member; m != nil {
		return math.Min(j.s.faces[k], (m.faceR-m.faceL)/10)
	}
	return j.s.faces[k]
}

// leastWidth is the bw of 9.6.1.2: of a statically determinate beam with its
// flange in tension the lesser of bf and 2bw. Demands are taken as those of one.
func (j *judge) leastWidth(k int) float64 {
	if j.s.flange != k {
		return j.s.bw
	}
	if m := j.member; m != nil && (m.left == statics.Fixed && m.right != statics.Free || m.right == statics.Fixed && m.left != statics.Free) {
		return j.s.bw
	}
	return math.Min(j.s.faces[k], 2*j.s.bw)
}

// bent is a moment with the axial force that acts with it.
type bent struct{ m, nu float64 }

// bendings are the moments of a sense that can govern.
func (j *judge) bendings(k int) []bent {
	if j.member != nil {
		return []bent{{j.moments[k], 0}}
	}
	var out []bent
	for i := range j.b.Demands {
		d := &j.b.Demands[i]
		m := j.moment(d.Moment)
		if k == 1 {
			m = -m
		}
		if m > 0 {
			out = append(out, bent{m, j.force(d.Axial)})
		}
	}
	return out
}

// cracking judges the bars nearest the tension face (24.3.2, 24.3.4).
func (j *judge) cracking(k int) {
	tension := j.beds[k]
	fy := math.Inf(1) // the lowest of the bars nearest the face
	for _, o := range tension.layers[0] {
		fy = math.Min(fy, o.fy)
	}
	limit := j.crack(tension.cover, fy)
	id := "crack.spacing"
	if len(tension.layers[0]) == 1 {
		j.check("crack.single-bar", j.bw, limit, "face %d", k)
	} else {
		j.check(id, tension.widest, limit, "face %d", k)
	}
	if j.s.flange != k {
		return
	}
	spread := j.spread(k)
	// The spread is about the web as evenly as the flange lets it: a bar and its
	// cover need room on a side before it can be asked for.
	beyond := (spread - j.bw) / 2
	if room := 2*j.cover + 2*tension.layers[0][0].r; beyond > room && len(tension.beside) == 0 {
		j.wrong("crack.flange-spread", 2, "face %d: nothing beside the web over %.5g", k, spread)
		return
	}
	xs := []float64{}
	for _, o := range slices.Concat(tension.layers[0], tension.beside) {
		if o.x >= -beyond && o.x <= j.bw+beyond {
			xs = append(xs, o.x)
		}
	}
	slices.Sort(xs)
	for i := 1; i < len(xs); i++ {
		j.check("crack.flange-spacing", xs[i]-xs[i-1], limit, "face %d", k)
	}
}

// crack is the greatest spacing of 24.3.2 with fs of 2/3 fy.
func (j *judge) crack(cc, fy float64) float64 {
	k := j.crackStress / (2.0 / 3 * fy)
	return math.Min(j.crack15*k-2.5*cc, j.crack12*k)
}
