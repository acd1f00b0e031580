package rederive

import (
	"fmt"
	"math"
	"slices"

	"soffit.example/bars"
	"soffit.example/beam"
)

// Violation is one thing found wrong.
type Violation struct {
	Rule        string // the id of the library's check of the same thing, or words
	Utilization float64
	Detail      string
}

// SideFace is the rule on bars along the side faces.
const SideFace = "side-face.spacing"

// SideSpacing is the rule on how far apart bars along the sides may be in
// torsion.
const SideSpacing = "torsion.longitudinal-spacing at the sides"

// Report is what was found. Scope lists reasons why the sectional method does
// not apply at all.
type Report struct {
	Violations []Violation
	// Judged is the greatest utilization found of each rule.
	Judged map[string]float64
	Scope  []string
	// Greatest moments found, for comparison: sagging and hogging, in the
	// units of the edition.
	Moments [2]float64
	// Nominal strengths for either sense; zero where it is not bent.
	Nominal [2]float64
	// Clear cover to the stirrups and the greater effective depth of the two
	// faces, in metres.
	Cover, Deepest float64
	Corner         float64 // of a corner bar at the bottom: its centre from the side, in metres
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

	s                  *shape
	bw, h, fc, fy, fyt float64 // bw of the strip in which the stirrups stand
	lambda             float64
	stone              float64
	cage               cage
	cover, dst         float64
	ownCover           bool    // the caller's, and enough for the stirrups
	beds               [2]*bed // bottom and top
	zones              []zone
	member             *member
	twist              *twist
	required           [2][]float64 // moments that shares of the steel carry
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
	angle       float64 // radians
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
	j.twist = j.twisting()
	j.forces()
	j.scope()
	return &Beam{j}, nil
}

// Bent reports whether any combination bends the beam so, sagging and
// hogging.
func (b *Beam) Bent() [2]bool { return b.ready.bent }

// Twisted reports whether some torque must be designed for.
func (b *Beam) Twisted() bool { return b.ready.twisted() }

// with is a judge of one layout.
func (b *Beam) with(l *beam.Layout) (*judge, error) {
	j := b.ready
	j.l = l
	j.report = &Report{Moments: j.moments, Scope: slices.Clone(j.report.Scope), Judged: map[string]float64{}}
	if err := j.place(); err != nil {
		return nil, err
	}
	metres := 0.001
	if j.us {
		metres = 0.0254
	}
	j.report.Cover = j.cover * metres
	if bed := j.beds[0]; bed.count > 0 {
		j.report.Corner = bed.layers[0][0].x * metres
	}
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
	j.torsion()
	j.hangers()
	j.ties()
	j.whole()
	j.ribs()
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
		u = 0
	case capacity > 0:
		u = demand / capacity
	}
	if u > 1+slack {
		j.wrong(rule, u, detail, args...)
		return
	}
	j.report.Judged[rule] = math.Max(j.report.Judged[rule], u)
}

func (j *judge) wrong(rule string, u float64, detail string, args ...any) {
	j.report.Judged[rule] = math.Max(j.report.Judged[rule], u)
	j.report.Violations = append(j.report.Violations, Violation{rule, u, fmt.Sprintf(detail, args...)})
}

func (j *judge) outOfScope(format string, args ...any) {
	j.report.Scope = append(j.report.Scope, fmt.Sprintf(format, args...))
}

func (j *judge) materials() {
	b := j.b
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
	j.lambda = j.lightness()
	j.s = j.shapeOf(b)
	j.bw, j.h = j.s.strip, j.s.h
}

// lightness is λ: of 318-14 by the kind of aggregate or the splitting strength
// (19.2.4.2, 19.2.4.3), of 318-19 by the density (Table 19.2.4.1(a)) or, of
// blends, by the kind (Table 19.2.4.1(b)).
func (j *judge) lightness() float64 {
	c := &j.b.Concrete
	kind := 1.0
	switch c.Kind {
	case beam.SandLightweight:
		kind = 0.85
	case beam.AllLightweight:
		kind = 0.75
	case beam.FineBlend:
		kind = 0.75 + 0.10*c.Normal
	case beam.CoarseBlend:
		kind = 0.85 + 0.15*c.Normal
	default:
		return 1
	}
	if !j.y19 {
		if !c.Splitting.IsZero() {
			return math.Min(1, j.stress(c.Splitting)/(j.split*math.Sqrt(j.fc)))
		}
		return kind
	}
	dense := 1.0
	switch wc := j.unitWeight(c.Density); {
	case wc <= j.lambdaLow:
		dense = 0.75
	case wc <= j.lambdaHigh:
		dense = math.Min(1, j.lambdaBy*wc)
	}
	if c.Kind == beam.FineBlend || c.Kind == beam.CoarseBlend {
		return kind
	}
	return dense
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
	largest, stirrup, bundle := 0, 0, 0.0
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
			if r.Bundled > 1 {
				bundle = math.Max(bundle, j.aroundBundle(j.length(s.Diameter)*math.Sqrt(float64(r.Bundled))))
			}
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
			j.wrong("shear.stirrup-size", float64(n)/8, "%s", z.Bar)
		}
		spaced := zone{
			from: j.length(z.From), to: j.length(z.To), s: j.length(z.Spacing), legs: z.Legs,
			db: d, area: j.area(s.Area) * float64(z.Legs), number: n, closed: z.Form != "open", angle: math.Pi / 2,
		}
		if z.Angle != 0 {
			spaced.angle = z.Angle * math.Pi / 180
			j.check("shear.stirrup-angle", 45, z.Angle, "zone %d", i)
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
		j.cover = math.Max(j.tableCover(largest), bundle)
	default:
		j.cover = math.Max(j.tableCover(stirrup), math.Max(j.tableCover(largest), bundle)-thickest)
	}
	j.cage.width, j.cage.depth, j.cage.inner = j.bw, j.h, j.cover+thickest
	j.cage.tucked = j.b.Readings.TuckedCorner
	j.cage.least = math.Max(j.gap, 4.0/3*j.stone)
	j.cage.between = j.cage.least // layers keep the distance that 26.4.2.1(a) asks of the aggregate too
	for k, face := range [2]beam.Face{beam.Bottom, beam.Top} {
		bed, err := j.lay(face)
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
			own = j.ownWeight(density, j.s.gross)
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

// apart sees that the bars of opposite faces lie clear of each other.
func (j *judge) apart() {
	sum := 0.0
	for _, b := range j.beds {
		top := 0.0
		for _, row := range b.layers {
			for _, o := range row {
				top = math.Max(top, o.y+o.high())
			}
		}
		sum += top
	}
	j.check("fit.depth", sum, j.h, "they meet")
}

// fit judges how the bars of a face lie.
func (j *judge) fit(k int) {
	b := j.beds[k]
	if b.count == 0 {
		if len(j.zones) > 0 {
			j.wrong("bars.corners", 2, "face %d has no bars", k)
		}
		return
	}
	// A cover that the caller gives is taken, but bars inside stirrups that
	// have theirs need their own.
	for _, row := range b.layers {
		for _, o := range row {
			if j.ownCover {
				j.check("cover.bar", j.tableCover(o.number), min(o.y-o.low(), min(o.x, j.bw-o.x)-o.wide()-o.real()), "number %d", o.number)
			}
		}
	}
	j.bundles(b)
	for _, f := range b.faults {
		j.wrong(f.rule, 2, "face %d: %s", k, f.what)
	}
	if b.tight > 0 {
		j.check("spacing.clear", 1, b.tight, "face %d", k)
	}
	if len(j.zones) > 0 && len(b.layers[0]) < 2 {
		j.wrong("bars.corners", 2, "one bar at face %d", k)
	}
	if len(b.layers) > 1 {
		j.check("aggregate.clear-spacing", j.stone, 0.75*j.cage.between, "face %d", k)
	}
	j.check("aggregate.form-width", j.stone, j.bw/5, "")
	for _, z := range j.zones {
		if z.legs > 2 {
			j.check("shear.leg-bars", float64(z.legs), float64(len(b.layers[0])), "face %d", k)
		}
	}
}

// bundles judges bars in contact (25.6.1, 20.5.1.3.5).
func (j *judge) bundles(b *bed) {
	for _, row := range b.layers {
		for _, o := range row {
			if o.n == 1 {
				continue
			}
			if o.number > 11 {
				j.wrong("bundle.bar-size", float64(o.number)/11, "number %d", o.number)
			}
			if len(j.zones) == 0 {
				j.wrong("bundle.enclosed", 2, "no stirrups")
			}
			if j.b.Cover.IsZero() {
				j.check("cover.bundle", j.aroundBundle(2*o.r), o.y-o.low(), "%d of number %d", o.n, o.number)
			}
		}
	}
}

// aroundBundle is the clear cover of a bundle that counts as one bar of a
// diameter (20.5.1.3.5).
func (j *judge) aroundBundle(diameter float64) float64 {
	if j.b.Exposure == beam.Ground {
		return j.coverGround
	}
	return math.Min(diameter, j.bundleCover)
}
