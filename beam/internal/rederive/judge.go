package rederive

import (
	"fmt"
	"math"
	"slices"

	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/beam/statics"
)

// Violation is one thing found wrong.
type Violation struct {
	Rule        string // topic and clause: "shear strength 22.5.1.1"
	Utilization float64
	Detail      string
}

// SideFace is the rule on bars along the side faces.
const SideFace = "side face 9.7.2.3"

// Report is what was found. Scope lists reasons why the sectional method does
// not apply at all.
type Report struct {
	Violations []Violation
	Scope      []string
	// Greatest moments found, for comparison: sagging and hogging, in the
	// units of the edition.
	Moments [2]float64
	// Nominal strengths for either sense; zero where it is not bent.
	Nominal [2]float64
	// Clear cover to the stirrups and the greater effective depth of the two
	// faces, in metres.
	Cover, Deepest float64
	// Tight is the least clear gap between bars of a layer over the gap
	// required, at the bottom and at the top.
	Tight [2]float64
}

// OK reports whether nothing is wrong and the method applies.
func (r *Report) OK() bool { return len(r.Violations) == 0 && len(r.Scope) == 0 }

func (r *Report) String() string {
	return fmt.Sprintf("violations %v, scope %v", r.Violations, r.Scope)
}

// slack is the share by which a limit may be exceeded and still be met.
const slack = 1e-6

// judge is a beam while it is judged.
type judge struct {
	*printed
	b       *beam.Brief
	l       *beam.Layout
	catalog bars.Catalog
	report  *Report

	bw, h, fc, fy, fyt float64
	lambda             float64
	stone              float64
	cage               cage
	cover, dst         float64
	ownCover           bool    // the caller's, and enough for the stirrups
	beds               [2]*bed // bottom and top
	zones              []zone
	member             *member
	all                []section
	bent               [2]bool
	moments            [2]float64
	scale              float64
}

// zone is a run of stirrups.
type zone struct {
	from, to, s float64
	legs        int
	db, area    float64
	number      int
	closed      bool
}

// Beam is a brief with its forces found, ready to judge layouts. It is safe
// for concurrent use.
type Beam struct{ ready judge }

// Prepare takes a brief as the caller gave it, for the edition of an id such
// as "ACI 318-19": what it leaves open is taken as the library documents. The
// error says that there is nothing to judge.
func Prepare(id string, b beam.Brief) (*Beam, error) {
	p, ok := edition(id)
	if !ok {
		return nil, fmt.Errorf("rederive: no edition %q", id)
	}
	catalog, err := bars.Lookup(b.Reinforcement.Catalog)
	if err != nil {
		return nil, err
	}
	j := judge{printed: &p, b: &b, catalog: catalog, report: &Report{}}
	j.materials()
	j.forces()
	j.scope()
	return &Beam{j}, nil
}

// Bent reports whether any combination bends the beam so, sagging and
// hogging.
func (b *Beam) Bent() [2]bool { return b.ready.bent }

// with is a judge of one layout.
func (b *Beam) with(l *beam.Layout) (*judge, error) {
	j := b.ready
	j.l = l
	j.report = &Report{Moments: j.moments, Scope: slices.Clone(j.report.Scope)}
	if err := j.place(); err != nil {
		return nil, err
	}
	metres := 0.001
	if j.us {
		metres = 0.0254
	}
	j.report.Cover = j.cover * metres
	for k, bed := range j.beds {
		j.report.Tight[k] = bed.tight
		if bed.count > 0 {
			j.report.Deepest = math.Max(j.report.Deepest, (j.h-bed.centroid)*metres)
		}
	}
	return &j, nil
}

// Judge judges a layout. The error says that it is none.
func (b *Beam) Judge(l beam.Layout) (*Report, error) {
	j, err := b.with(&l)
	if err != nil {
		return nil, err
	}
	j.apart()
	for k := range j.beds {
		j.fit(k)
	}
	j.bending(0)
	j.bending(1)
	j.shear()
	j.ties()
	j.whole()
	j.sides()
	return j.report, nil
}

// Bars judges the longitudinal bars of a layout alone: how they lie, and
// bending.
func (b *Beam) Bars(l beam.Layout) (*Report, error) {
	j, err := b.with(&l)
	if err != nil {
		return nil, err
	}
	j.apart()
	for k := range j.beds {
		j.fit(k)
	}
	j.bending(0)
	j.bending(1)
	return j.report, nil
}

// Whole judges the limits of the member as such, whatever its bars.
func (b *Beam) Whole(l beam.Layout) (*Report, error) {
	j, err := b.with(&l)
	if err != nil {
		return nil, err
	}
	j.whole()
	return j.report, nil
}

// Judge judges one layout of a brief.
func Judge(id string, b beam.Brief, l beam.Layout) (*Report, error) {
	p, err := Prepare(id, b)
	if err != nil {
		return nil, err
	}
	return p.Judge(l)
}

// check reports a demand above its capacity.
func (j *judge) check(rule string, demand, capacity float64, detail string, args ...any) {
	u := math.Inf(1)
	switch {
	case demand <= 0:
		return
	case capacity > 0:
		u = demand / capacity
	}
	if u > 1+slack {
		j.wrong(rule, u, detail, args...)
	}
}

func (j *judge) wrong(rule string, u float64, detail string, args ...any) {
	j.report.Violations = append(j.report.Violations, Violation{rule, u, fmt.Sprintf(detail, args...)})
}

func (j *judge) outOfScope(format string, args ...any) {
	j.report.Scope = append(j.report.Scope, fmt.Sprintf(format, args...))
}

func (j *judge) materials() {
	b := j.b
	j.bw, j.h = j.length(b.Section.Width), j.length(b.Section.Depth)
	j.fc, j.fy = j.stress(b.Concrete.Strength), j.stress(b.Reinforcement.Yield)
	j.fyt = j.fy
	if !b.Reinforcement.StirrupYield.IsZero() {
		j.fyt = j.stress(b.Reinforcement.StirrupYield)
	}
	j.fyt = math.Min(j.fyt, j.fytMost)
	j.stone = j.aggregate
	if !b.Concrete.Aggregate.IsZero() {
		j.stone = j.length(b.Concrete.Aggregate)
	}
	j.lambda = 1
	if light := b.Concrete.Kind == beam.SandLightweight || b.Concrete.Kind == beam.AllLightweight; light {
		wc := j.unitWeight(b.Concrete.Density)
		switch {
		case !j.y19 && b.Concrete.Kind == beam.SandLightweight:
			j.lambda = 0.85
		case !j.y19:
			j.lambda = 0.75
		case wc <= j.lambdaLow:
			j.lambda = 0.75
		case wc <= j.lambdaHigh:
			j.lambda = math.Min(1, j.lambdaBy*wc)
		}
	}
}

// tableCover is the clear cover that a bar of a number needs.
func (j *judge) tableCover(number int) float64 {
	switch j.b.Exposure {
	case beam.Ground:
		return j.coverGround
	case beam.Weather:
		if number >= 6 {
			return j.coverOut6
		}
		return j.coverOut
	}
	return j.coverIn
}

// place takes the layout apart and finds where its bars lie.
func (j *judge) place() error {
	largest, stirrup := 0, 0
	var thickest float64
	for i := range j.l.Longitudinal {
		r := &j.l.Longitudinal[i]
		s, err := j.catalog.Size(r.Bar)
		if err != nil {
			return err
		}
		n := j.number(j.length(s.Diameter))
		if n < 3 || n > 18 {
			j.outOfScope("bar %s is of no standard size", r.Bar)
		}
		if r.Face != beam.Side {
			largest = max(largest, n)
		}
	}
	for i := range j.l.Transverse {
		z := &j.l.Transverse[i]
		s, err := j.catalog.Size(z.Bar)
		if err != nil {
			return err
		}
		d := j.length(s.Diameter)
		n := j.number(d)
		if n < 3 || n > 8 {
			j.wrong("stirrup size 25.3.2", float64(n)/8, "%s", z.Bar)
		}
		spaced := zone{
			from: j.length(z.From), to: j.length(z.To), s: j.length(z.Spacing), legs: z.Legs,
			db: d, area: j.area(s.Area) * float64(z.Legs), number: n, closed: z.Form != "open",
		}
		if z.Count > 0 {
			spaced.to = math.Min(spaced.to, spaced.from+float64(z.Count)*spaced.s)
		}
		j.zones = append(j.zones, spaced)
		stirrup = max(stirrup, n)
		if d > thickest {
			thickest = d
			bend, err := s.Bend(bars.Stirrup)
			if err != nil {
				return err
			}
			j.cage.bend = j.length(bend.Inside) / 2
		}
	}
	j.dst = thickest
	switch {
	case !j.b.Cover.IsZero():
		j.cover = j.length(j.b.Cover)
		j.ownCover = thickest > 0 && j.cover >= j.tableCover(stirrup)*(1-slack)
	case thickest == 0:
		j.cover = j.tableCover(largest)
	default:
		j.cover = math.Max(j.tableCover(stirrup), j.tableCover(largest)-thickest)
	}
	j.cage.width, j.cage.depth, j.cage.inner = j.bw, j.h, j.cover+thickest
	j.cage.tucked = j.b.Readings.TuckedCorner
	j.cage.least = math.Max(j.gap, 4.0/3*j.stone)
	j.cage.between = j.cage.least // layers keep the distance that 26.4.2.1(a) asks of the aggregate too
	for k, face := range [2]beam.Face{beam.Bottom, beam.Top} {
		bed, err := j.lay(&j.cage, j.catalog, j.l, face)
		if err != nil {
			return err
		}
		j.beds[k] = bed
	}
	return nil
}

// forces analyses the span, or takes the demands as they are.
func (j *judge) forces() {
	if len(j.b.Spans) > 0 {
		own := 0.0
		if !j.b.NoSelfWeight {
			density := j.density
			if !j.b.Concrete.Density.IsZero() {
				density = j.unitWeight(j.b.Concrete.Density)
			}
			own = j.ownWeight(density, j.bw*j.h)
		}
		j.member = newMember(j.printed, j.b, own)
		j.all = j.member.stations()
		for k, sign := range [2]float64{1, -1} {
			j.moments[k], j.scale = j.member.greatest(j.all, sign)
			j.bent[k] = j.moments[k] > 1e-9*j.scale
		}
	} else {
		for i := range j.b.Demands {
			m := j.moment(j.b.Demands[i].Moment)
			j.moments[0], j.moments[1] = math.Max(j.moments[0], m), math.Max(j.moments[1], -m)
		}
		j.bent[0], j.bent[1] = j.moments[0] > 0, j.moments[1] > 0
	}
}

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
		if n := j.force(d.Axial); n < 0 || n >= 0.1*j.fc*j.bw*j.h*(1+slack) {
			j.outOfScope("axial force of %g", n)
		}
		j.torque(j.moment(d.Torque), j.force(d.Axial))
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
	j.twist()
}

// torque compares a torque with what may be neglected (9.5.4.1, 22.7.4.1).
func (j *judge) torque(t, nu float64) {
	if t == 0 {
		return
	}
	lr := j.lambda * math.Min(math.Sqrt(j.fc), j.rootMost)
	acp, pcp := j.bw*j.h, 2*(j.bw+j.h)
	axial := 4.0
	if !j.us {
		axial = 0.33
	}
	threshold := j.torsion * lr * acp * acp / pcp * math.Sqrt(math.Max(0, 1+nu/(axial*acp*lr)))
	if math.Abs(t) >= 0.75*threshold*(1+slack) {
		j.outOfScope("torque of %g against %g", t, 0.75*threshold)
	}
}

// twist follows the torques along the span.
func (j *judge) twist() {
	m := j.member
	var cases [beam.Earthquake + 1]func(x float64) float64
	any := false
	for k := range cases {
		var points []place
		spread := 0.0
		for i := range j.b.Loads {
			l := &j.b.Loads[i]
			if int(l.Case) != k {
				continue
			}
			switch l.Shape {
			case beam.Torque:
				points = append(points, place{j.length(l.At), j.moment(l.Moment)})
			case beam.UniformTorque:
				spread += j.moment(l.Moment)
			}
		}
		if len(points) == 0 && spread == 0 {
			continue
		}
		any = true
		// Twist of a prismatic bar with both ends held vanishes over its length.
		held := [2]bool{m.left != statics.Free, m.right != statics.Free}
		start := 0.0
		for _, p := range points {
			switch {
			case held[0] && held[1]:
				start += p.size * (m.length - p.at) / m.length
			case held[0]:
				start += p.size
			}
		}
		switch {
		case held[0] && held[1]:
			start += spread / 2
		case held[0]:
			start += spread
		}
		cases[k] = func(x float64) float64 {
			t := start - spread*x/m.length
			for _, p := range points {
				if p.at < x {
					t -= p.size
				}
			}
			return t
		}
	}
	if !any {
		return
	}
	most := 0.0
	for i := range m.combos {
		for n := 0; n <= 256; n++ {
			x := m.faceL + (m.faceR-m.faceL)*float64(n)/256
			t := 0.0
			for k, f := range m.combos[i].factors {
				if f != 0 && cases[k] != nil {
					t += f * cases[k](x)
				}
			}
			most = math.Max(most, math.Abs(t))
		}
	}
	j.torque(most, 0)
}

// apart sees that the bars of opposite faces lie clear of each other.
func (j *judge) apart() {
	sum := 0.0
	for _, b := range j.beds {
		top := 0.0
		for _, row := range b.layers {
			for _, o := range row {
				top = math.Max(top, o.y+o.r)
			}
		}
		sum += top
	}
	j.check("bars of opposite faces", sum, j.h, "they meet")
}

// fit judges how the bars of a face lie.
func (j *judge) fit(k int) {
	b := j.beds[k]
	if b.count == 0 {
		if len(j.zones) > 0 {
			j.wrong("bars in bends 25.7.1.2", 2, "face %d has no bars", k)
		}
		return
	}
	// A cover that the caller gives is taken, but bars inside stirrups that
	// have theirs need their own.
	for _, row := range b.layers {
		for _, o := range row {
			if j.ownCover {
				j.check("cover of bars 20.5.1.3", j.tableCover(o.number), min(o.y, o.x, j.bw-o.x)-o.r, "number %d", o.number)
			}
		}
	}
	for _, f := range b.faults {
		j.wrong("fit 25.2, 25.3", 2, "%s", f)
	}
	j.check("clear spacing 25.2.1", 1, b.tight, "face %d", k)
	if len(j.zones) > 0 && len(b.layers[0]) < 2 {
		j.wrong("bars in bends 25.7.1.2", 2, "one bar at face %d", k)
	}
	if len(b.layers) > 1 {
		j.check("aggregate between layers 26.4.2.1", j.stone, 0.75*j.cage.between, "face %d", k)
	}
	j.check("aggregate in the form 26.4.2.1", j.stone, j.bw/5, "")
	for _, z := range j.zones {
		if z.legs > 2 {
			j.check("bars at legs 25.7.1.2", float64(z.legs), float64(len(b.layers[0])), "face %d", k)
		}
	}
}

// bending judges one sense: 0 sagging, 1 hogging.
func (j *judge) bending(k int) {
	if !j.bent[k] {
		return
	}
	tension, pressed := j.beds[k], j.beds[1-k]
	mu := j.moments[k]
	if tension.count == 0 {
		j.wrong("flexure 9.5.1.1", math.Inf(1), "no bars at tension face %d", k)
		return
	}
	steel := func(share float64, compression bool) []steelAt {
		var out []steelAt
		for _, row := range tension.layers {
			for _, o := range row {
				out = append(out, steelAt{j.h - o.y, share * o.area})
			}
		}
		if compression && pressed.relied {
			for _, row := range pressed.layers {
				for _, o := range row {
					out = append(out, steelAt{o.y, o.area})
				}
			}
		}
		return out
	}
	g := &j.b.Readings
	s := j.strength(j.bw, j.h, j.fc, j.fy, steel(1, true), !g.IgnoreDisplaced, g.RoundedYield)
	if !s.ok {
		j.wrong("flexure 9.5.1.1", math.Inf(1), "no equilibrium")
		return
	}
	j.report.Nominal[k] = s.mn
	j.check("flexure 9.5.1.1", mu, s.phi*s.mn, "sense %d: Mu %.5g, φ %.4g, Mn %.5g", k, mu, s.phi, s.mn)
	j.check("least strain 9.3.3.1", s.leastEt, s.strain, "sense %d", k)

	d := j.h - tension.centroid
	fy := j.fy
	if j.asCap > 0 {
		fy = math.Min(fy, j.asCap)
	}
	least := math.Max(j.asRoot*math.Sqrt(j.fc), j.asFloor) / fy * j.bw * d
	if tension.area < least*(1-slack) {
		// 9.6.1.3: enough if three quarters of the steel would do.
		q := j.strength(j.bw, j.h, j.fc, j.fy, steel(0.75, false), !g.IgnoreDisplaced, g.RoundedYield)
		if !q.ok || q.phi*q.mn < mu*(1-slack) {
			j.wrong("least steel 9.6.1", least/tension.area, "sense %d: %.5g of %.5g", k, tension.area, least)
		}
	}

	limit := j.crack(tension.cover)
	if len(tension.layers[0]) == 1 {
		j.check("crack control 24.3.3", j.bw, limit, "sense %d", k)
	} else {
		j.check("crack control 24.3.2", tension.widest, limit, "sense %d", k)
	}
}

// crack is the greatest spacing of 24.3.2 with fs of 2/3 fy.
func (j *judge) crack(cc float64) float64 {
	k := j.crackStress / (2.0 / 3 * j.fy)
	return math.Min(j.crack15*k-2.5*cc, j.crack12*k)
}

// whole judges the limits of the member as such.
func (j *judge) whole() {
	if !j.b.Braced.IsZero() {
		j.check("bracing 9.2.3.1", j.length(j.b.Braced), 50*j.bw, "")
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
	if j.b.Concrete.Kind == beam.SandLightweight || j.b.Concrete.Kind == beam.AllLightweight {
		if wc := j.unitWeight(j.b.Concrete.Density); wc >= j.lightLow && wc <= j.lightHigh {
			least *= math.Max(j.light-j.lightSlope*wc, j.lightMost)
		}
	}
	j.check("least depth 9.3.1.1", least, j.h, "")
}

// sides judges the bars along the side faces of deep beams (9.7.2.3).
func (j *judge) sides() {
	if j.h <= j.deep*(1+slack) {
		return
	}
	limit := j.crack(j.cover + j.dst)
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
			for n := 1; n <= r.Count; n++ {
				y := last + float64(n)*j.length(r.Spacing)
				if y >= j.h {
					j.wrong(SideFace, 2, "a bar at %.5g lies outside the beam", y)
				}
				if k == 1 {
					y = j.h - y
				}
				heights = append(heights, y)
			}
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
