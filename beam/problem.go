package beam

import (
	"fmt"
	"slices"

	"soffit.example/bars"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// Problem is a brief after the code has filled its gaps: sizes looked up,
// loads combined and analysed. It is fixed before the first layout is tried.
type Problem struct {
	Brief   Brief // resolved copy: no field is left to the code any more
	Code    Code
	System  units.System // of the code's edition, for buildable steps
	Catalog bars.Catalog
	Forces  Forces
	Kept    []Combination
	Dropped []DroppedCombination

	Geometry   Geometry       // of the brief's section
	Twisted    bool           // a torque must be designed for
	SelfWeight units.LineLoad // of the brief's section; zero if the brief excludes it
}

// Faces are the positions of the support faces of a span, from the centre of
// its left support; at a free end, the end itself.
func (p *Problem) Faces(span int) (left, right units.Length) {
	l := p.Brief.Spans[span-1]
	return p.Brief.Supports[span-1].Width.Scale(0.5), l.Sub(p.Brief.Supports[span].Width.Scale(0.5))
}

// length of the whole beam; zero with demands given directly.
func (p *Problem) length() (sum units.Length) {
	for _, l := range p.Brief.Spans {
		sum = sum.Add(l)
	}
	return sum
}

// ClearSpan is the distance between the support faces of a span.
func (p *Problem) ClearSpan(span int) units.Length {
	left, right := p.Faces(span)
	return right.Sub(left)
}

// bent reports whether any combination bends the beam in a sense between the
// faces of its supports.
func (p *Problem) bent(sense Sense) bool {
	f := &p.Forces
	for _, d := range f.Demands() {
		if sign := d.Moment.Compare(units.Moment{}); sense == Positive && sign > 0 || sense == Negative && sign < 0 {
			return true
		}
	}
	for span := 1; span <= f.Spans(); span++ {
		from, to := p.Faces(span)
		if _, ok := f.Moment(sense, span, from, to); ok {
			return true
		}
	}
	return false
}

// prepared is a problem on its way: resolved and analysed, with what was
// assumed so far and what puts it out of scope.
type prepared struct {
	*Problem
	register Register
	refusals []Refusal
	// assumedDepth is the effective depth of each sense that the search
	// started from; zero where there was no search.
	assumedDepth [Negative + 1]units.Length
	// assumedWeight is the self-weight of the first section tried.
	assumedWeight units.LineLoad
	any           bool // the first layout that passes will do
}

// prepare resolves a brief under a code and analyses it. The error is an
// *InputError holding every fault found.
func prepare(code Code, given Brief) (*prepared, error) {
	b := given.clone()
	f := newFaults(code.Edition().System)
	catalog, err := bars.Lookup(b.Reinforcement.Catalog)
	if err != nil {
		f.add("/reinforcement/catalog", "an id of the bar catalogs", "%v", err)
	}
	b.check(&f, catalog)
	p := &prepared{Problem: &Problem{Code: code, System: f.system, Catalog: catalog}}
	for _, more := range code.Resolve(&b, &p.register) {
		f.addNew(more)
	}
	if !catalog.IsZero() {
		f.allowed("/preferences/bars", b.Preferences.Bars, bars.Main, p.Problem)
		f.allowed("/preferences/stirrups", b.Preferences.Stirrups, bars.Stirrup, p.Problem)
	}
	if err := f.err(); err != nil {
		return nil, err
	}
	b.Preferences.resolve(p.Problem)
	geometry, wrong := GeometryOf(&b.Section)
	if f.list = append(f.list, wrong...); len(f.list) > 0 {
		return nil, f.err()
	}
	p.Brief, p.Geometry = b, geometry
	if err := p.analyse(); err != nil {
		return nil, err
	}
	p.Twisted = code.Twists(p.Problem)
	p.refusals = code.Scope(p.Problem)
	return p, nil
}

// Validate reports every fault of a brief under a code, as Design would, and
// designs nothing. The error is an *InputError, or nil.
func Validate(code Code, brief Brief) error {
	_, err := prepare(code, brief)
	return err
}

// ValidateLayout reports every fault of a layout, as CheckLayout would, under a
// brief without fault.
func ValidateLayout(code Code, brief Brief, layout Layout) error {
	p, err := prepare(code, brief)
	if err != nil {
		return err
	}
	if _, faults := trialOf(p.Problem, &layout); len(faults) > 0 {
		return &InputError{Faults: faults}
	}
	return nil
}

// clone copies a brief so that resolving it leaves the caller's alone.
func (b Brief) clone() Brief {
	b.Spans = slices.Clone(b.Spans)
	b.Supports = slices.Clone(b.Supports)
	b.Loads = slices.Clone(b.Loads)
	b.Demands = slices.Clone(b.Demands)
	b.Preferences.Bars = slices.Clone(b.Preferences.Bars)
	b.Preferences.Stirrups = slices.Clone(b.Preferences.Stirrups)
	b.Preferences.Depths = slices.Clone(b.Preferences.Depths)
	b.Section = b.Section.clone()
	return b
}

// resolve fills the preferences that the caller left open. They are choices
// of the trade, not of a code.
func (p *Preferences) resolve(pr *Problem) {
	if len(p.Bars) == 0 {
		for _, s := range pr.Catalog.Sizes() {
			if pr.Code.Allows(bars.Main, s) {
				p.Bars = append(p.Bars, s.Name)
			}
		}
	}
	if len(p.Stirrups) == 0 {
		for _, s := range pr.Catalog.Sizes() {
			if _, err := s.Bend(bars.Stirrup); err == nil && pr.Code.Allows(bars.Stirrup, s) && len(p.Stirrups) < usualStirrups {
				p.Stirrups = append(p.Stirrups, s.Name)
			}
		}
	}
	setIfZero(&p.MaxLayers, 2)
	setIfZero(&p.MaxLegs, 4)
	setIfZero(&p.MaxZones, 3)
	setIfZero(&p.KeepBest, 3)
	p.KeepBest = max(p.KeepBest, 0)
	if p.Prefer == 0 {
		p.Prefer = LeastSteel
	}
	if p.SpacingBy.IsZero() {
		p.SpacingBy = units.Inch.Of(0.5)
		if pr.System == units.SI {
			p.SpacingBy = units.Millimetre.Of(10)
		}
	}
}

// usualStirrups is how many of the smallest sizes stirrups are chosen from
// unless the brief names them (common practice, no source).
const usualStirrups = 3

func setIfZero(v *int, def int) {
	if *v == 0 {
		*v = def
	}
}

// atDepth is the same problem with another overall depth: analysed again,
// because the beam's own weight follows the depth.
func (p *prepared) atDepth(d units.Length) (*prepared, error) {
	q := *p.Problem
	q.Brief.Section.Depth = d
	q.Geometry, _ = GeometryOf(&q.Brief.Section)
	n := &prepared{Problem: &q, register: p.register.clone(), assumedWeight: p.assumedWeight}
	if err := n.analyse(); err != nil {
		return nil, err
	}
	n.Twisted = q.Code.Twists(n.Problem)
	n.refusals = q.Code.Scope(n.Problem)
	return n, nil
}

// analyse finds the factored forces of the resolved brief.
func (p *prepared) analyse() error {
	b := &p.Brief
	if len(b.Demands) > 0 {
		p.Forces = demandForces(b.Demands)
		return nil
	}
	p.SelfWeight = units.LineLoad{}
	if !b.NoSelfWeight {
		p.SelfWeight = b.Concrete.Density.Weight().MulArea(p.Geometry.Gross)
		p.assumeWeight()
	}
	p.Kept, p.Dropped = p.Code.Combinations(b)
	forces, err := memberForces(b, p.SelfWeight, p.Kept)
	if err != nil {
		return &InputError{Faults: []Fault{analysisFault(err)}}
	}
	p.Forces = forces
	return nil
}

// memberBeam is the beam as the analysis sees it.
func memberBeam(b *Brief) statics.Beam {
	m := statics.Beam{Spans: make([]statics.Span, len(b.Spans)), Supports: make([]statics.Support, len(b.Supports))}
	for i, l := range b.Spans {
		m.Spans[i] = statics.Span{Length: l}
	}
	for i, s := range b.Supports {
		m.Supports[i] = statics.Support{Kind: s.Kind}
	}
	return m
}

// memberLoads are the loads that bend the beam, its own weight among them.
// Torques do not.
func memberLoads(b *Brief, selfWeight units.LineLoad) []statics.Load {
	loads := make([]statics.Load, 0, len(b.Loads)+1)
	if !selfWeight.IsZero() {
		loads = append(loads, statics.Load{ID: "self-weight", Case: Dead.String(), Shape: statics.Uniform{Intensity: selfWeight}})
	}
	for i := range b.Loads {
		l := &b.Loads[i]
		s := statics.Load{Case: l.Case.String(), Span: l.Span}
		switch l.Shape {
		case Uniform:
			s.Shape = statics.Uniform{Intensity: l.Intensity}
		case Partial:
			end := l.Intensity
			if l.Varies {
				end = l.IntensityEnd
			}
			s.Shape = statics.Partial{From: l.From, To: l.To, Intensity: l.Intensity, IntensityEnd: end}
		case PointLoad:
			s.Shape = statics.Point{Force: l.Force, At: l.At}
		case Couple:
			s.Shape = statics.Couple{Moment: l.Moment, At: l.At}
		default:
			continue
		}
		loads = append(loads, s)
	}
	return loads
}

// assumeWeight lists the self-weight of the first section tried.
func (p *prepared) assumeWeight() {
	if !p.assumedWeight.IsZero() {
		return
	}
	p.assumedWeight = p.SelfWeight
	p.register.Assume(Assumption{
		ID:      "self-weight.section",
		Assumed: p.describeWeight(),
		UsedIn:  []string{"flexure", "shear"},
	})
}

// describeWeight says the self-weight and the section that it is of.
func (p *Problem) describeWeight() string {
	s := p.Brief.Section
	of := p.System.Format(s.Width.Amount()) + " by " + p.System.Format(s.Depth.Amount())
	if s.Shape != Rectangular {
		of = p.System.Format(p.Geometry.Gross.Amount())
		if s.Flange() == Top {
			of += ", the flange as far as it works with the web"
		}
	}
	return fmt.Sprintf("%s of self-weight, from a section of %s", p.System.Format(p.SelfWeight.Amount()), of)
}
