package beam

import (
	"slices"

	"soffit.example/beam/statics"
	"soffit.example/units"
)

// Action is what one combination asks of one section.
type Action struct {
	Combination string
	Span        int // 1-based; zero for a demand given directly
	At          units.Length
	Moment      units.Moment
	Shear       units.Force
	Torque      units.Moment
	// Compatible is the part of Torque that compatibility imposes, which may be
	// shed.
	Compatible units.Moment
	Axial      units.Force
}

// Forces are the factored forces of a problem: of every combination along
// every span, or the demands that the caller gave.
type Forces struct {
	spans     []spanForces
	reactions []Reaction
	demands   []Action
}

// Reaction is what the combinations ask of one support: the greatest and least
// force, positive upward, so that a negative least is uplift, and for a fixed
// end the greatest moment that it must hold, whichever way it turns.
type Reaction struct {
	Support         int // 1-based, left to right
	Most, Least     units.Force
	MostBy, LeastBy string // combinations
	Moment          units.Moment
	MomentBy        string
	// Torque is the greatest that the support must hold against twist, whichever
	// way it turns, as analysed: before any of it is shed to neighbours.
	Torque   units.Moment
	TorqueBy string
}

// spanForces are the forces along one span.
type spanForces struct {
	all    *statics.Lines
	lines  []*statics.Line // the same, one a combination
	breaks []units.Length
	length float64 // m
	twists []twist
	holds  [2]bool // whether each end holds against twist

	// known keeps the extremes that every trial of a search asks for: between
	// the support faces, over one depth from each, and over the whole span.
	known [4]stretch
	// faces keeps the actions at the support faces, on the inner side of each,
	// for the same reason.
	faces [2]struct {
		at      units.Length
		actions []Action
	}
}

// stretch is a length of a span with its extremes.
type stretch struct {
	from, to units.Length
	extremes statics.Extremes
}

// extremes are those of all combinations between two positions.
func (sp *spanForces) extremes(from, to units.Length) (statics.Extremes, error) {
	for i := range sp.known {
		if k := &sp.known[i]; from == k.from && to == k.to {
			return k.extremes, nil
		}
	}
	return sp.all.Extremes(from, to)
}

// keep fills known for a span between support faces.
func (sp *spanForces) keep(left, right, depth units.Length) error {
	known := [4]stretch{
		{from: left, to: right},
		{from: left, to: left.Add(depth).Min(sp.all.Length())},
		{from: right.Sub(depth).Max(units.Length{}), to: right},
		{to: sp.all.Length()},
	}
	for i := range known {
		var err error
		if known[i].extremes, err = sp.all.Extremes(known[i].from, known[i].to); err != nil {
			return err
		}
	}
	sp.known = known
	return nil
}

// twist is one torque on a span, with its factor in each combination.
type twist struct {
	at      float64 // m; meaningless if spread
	torque  float64 // N-m, in all
	spread  bool    // evenly over the span
	path    TorquePath
	factors []float64
}

// Demands lists the demands that the caller gave in place of spans.
func (f *Forces) Demands() []Action { return f.demands }

// Reactions are the factored reactions of the supports that hold; none with
// demands given directly.
func (f *Forces) Reactions() []Reaction { return f.reactions }

// Spans is the number of analysed spans; zero with demands given directly.
func (f *Forces) Spans() int { return len(f.spans) }

// Combinations is the number of combinations analysed, which Action counts
// through from zero.
func (f *Forces) Combinations() int {
	if len(f.spans) == 0 {
		return 0
	}
	return len(f.spans[0].lines)
}

// noMoment is the moment below which a beam is not bent in a sense, as a
// share of the greatest moment of the span: what rounding leaves.
const noMoment = 1e-12

// Moment is the action with the largest moment of a sense between two
// positions of a span, at its true position. ok is false where no
// combination bends that way.
func (f *Forces) Moment(s Sense, span int, from, to units.Length) (a Action, ok bool) {
	e, err := f.spans[span-1].extremes(from, to)
	if err != nil {
		return Action{}, false
	}
	least := e.MomentMost.Moment.Abs().Max(e.MomentLeast.Moment.Abs()).Scale(noMoment)
	at := e.MomentMost
	if s == Negative {
		at = e.MomentLeast
		ok = at.Moment.Less(least.Neg())
	} else {
		ok = least.Less(at.Moment)
	}
	return f.action(span, at), ok
}

// Shear is the action with the largest magnitude of shear between two
// positions of a span.
func (f *Forces) Shear(span int, from, to units.Length) (a Action, ok bool) {
	e, err := f.spans[span-1].extremes(from, to)
	if err != nil {
		return Action{}, false
	}
	at := e.ShearMost
	if at.Shear.Abs().Less(e.ShearLeast.Shear.Abs()) {
		at = e.ShearLeast
	}
	return f.action(span, at), true
}

// action is an extreme of the analysis with its torque.
func (f *Forces) action(span int, at statics.Forces) Action {
	a := Action{Combination: at.ID, Span: span, At: at.At, Moment: at.Moment, Shear: at.Shear}
	sp := &f.spans[span-1]
	if len(sp.twists) > 0 {
		i := slices.IndexFunc(sp.lines, func(l *statics.Line) bool { return l.ID() == at.ID })
		a.Torque, a.Compatible = sp.torque(i, at.At, at.Side != statics.Left)
	}
	return a
}

// Action is what combination i asks at a position of a span, with its shear
// and moment simultaneous; where a force jumps, right picks the side.
func (f *Forces) Action(i, span int, at units.Length, right bool) Action {
	sp := &f.spans[span-1]
	for end := range sp.faces {
		if face := &sp.faces[end]; right == (end == 0) && at == face.at && i < len(face.actions) {
			return face.actions[i]
		}
	}
	line := sp.lines[i]
	before, after, err := line.At(at)
	if err != nil {
		return Action{Combination: line.ID(), Span: span, At: at}
	}
	if right {
		before = after
	}
	a := Action{Combination: line.ID(), Span: span, At: at, Moment: before.Moment, Shear: before.Shear}
	if len(sp.twists) > 0 {
		a.Torque, a.Compatible = sp.torque(i, at, right)
	}
	return a
}

// HasTorque reports whether any torque acts on a span.
func (f *Forces) HasTorque(span int) bool { return len(f.spans[span-1].twists) > 0 }

// Torque is the action with the largest magnitude of torque between two
// positions of a span; ok is false where none acts.
func (f *Forces) Torque(span int, from, to units.Length) (a Action, ok bool) {
	sp := &f.spans[span-1]
	if len(sp.twists) == 0 {
		return Action{}, false
	}
	for i := range sp.lines {
		for _, x := range append([]units.Length{from, to}, sp.breaks...) {
			if x.Less(from) || to.Less(x) {
				continue
			}
			for _, right := range [2]bool{false, true} {
				if c := f.Action(i, span, x, right); a.Torque.Abs().Less(c.Torque.Abs()) {
					a, ok = c, true
				}
			}
		}
	}
	return a, ok
}

// Breaks appends the positions in a span where the shear or moment of any
// combination changes its expression: supports, loads, load ends.
func (f *Forces) Breaks(dst []units.Length, span int) []units.Length {
	return append(dst, f.spans[span-1].breaks...)
}

// Lines are the exact shear and moment of every combination along a span.
func (f *Forces) Lines(span int) *statics.Lines { return f.spans[span-1].all }

// torque is the internal torque under combination i, and the part of it that
// compatibility imposes. A prismatic span shares a torque between the ends that
// hold in inverse proportion to distance.
func (sp *spanForces) torque(i int, at units.Length, right bool) (all, compatible units.Moment) {
	x, sum, part := at.In(units.Metre), 0.0, 0.0
	for _, w := range sp.twists {
		t := w.torque * w.factors[i]
		toLeft := 0.0 // share that the left end takes
		switch {
		case sp.holds[0] && sp.holds[1]:
			toLeft = 0.5
			if !w.spread {
				toLeft = 1 - w.at/sp.length
			}
		case sp.holds[0]:
			toLeft = 1
		}
		passed := x / sp.length
		if !w.spread {
			passed = 0
			if x > w.at || x == w.at && right {
				passed = 1
			}
		}
		sum += t * (toLeft - passed)
		if w.path == CompatibilityTorque {
			part += t * (toLeft - passed)
		}
	}
	return units.NewtonMetre.Of(sum), units.NewtonMetre.Of(part)
}

// demandForces are the forces of demands given directly.
func demandForces(demands []Demand) Forces {
	f := Forces{demands: make([]Action, len(demands))}
	for i, d := range demands {
		f.demands[i] = Action{Combination: d.Name, Moment: d.Moment, Shear: d.Shear, Torque: d.Torque, Axial: d.Axial}
		if d.Path == CompatibilityTorque {
			f.demands[i].Compatible = d.Torque
		}
	}
	return f
}

// memberForces analyses the beam of a brief under its combinations.
func memberForces(b *Brief, selfWeight units.LineLoad, kept []Combination) (Forces, error) {
	loads := memberLoads(b, selfWeight)
	if len(loads) == 0 { // torques alone: a load of nothing keeps the analysis whole
		loads = append(loads, statics.Load{Case: Dead.String(), Shape: statics.Uniform{}})
	}
	cases, err := statics.Analyze(memberBeam(b), loads)
	if err != nil {
		return Forces{}, err
	}
	loaded := slices.Collect(cases.IDs())
	combinations := make([]statics.Combination, 0, len(kept))
	for _, c := range kept {
		s := statics.Combination{ID: c.ID, Factors: make([]statics.Factor, 0, len(c.Factors))}
		for _, f := range c.Factors {
			if id := f.Case.String(); slices.Contains(loaded, id) {
				s.Factors = append(s.Factors, statics.Factor{Case: id, Value: f.Factor})
			}
		}
		combinations = append(combinations, s)
	}
	response, err := cases.Combine(combinations)
	if err != nil {
		return Forces{}, err
	}
	f := Forces{spans: make([]spanForces, len(b.Spans))}
	for i := range f.spans {
		all, err := response.Lines(i + 1)
		if err != nil {
			return Forces{}, err
		}
		sp := &f.spans[i]
		sp.all, sp.length = all, b.Spans[i].In(units.Metre)
		for _, l := range all.All() {
			sp.lines = append(sp.lines, l)
		}
		sp.breaks = all.AppendBreaks(nil)
		sp.holds = [2]bool{b.Supports[i].Kind != statics.Free, b.Supports[i+1].Kind != statics.Free}
		sp.addTwists(b.Loads, i+1, kept)
		left, right := b.Supports[i].Width.Scale(0.5), b.Spans[i].Sub(b.Supports[i+1].Width.Scale(0.5))
		if err := sp.keep(left, right, b.Section.Depth); err != nil {
			return Forces{}, err
		}
		for end, at := range [2]units.Length{left, right} {
			actions := make([]Action, len(sp.lines))
			for k := range sp.lines {
				actions[k] = f.Action(k, i+1, at, end == 0)
			}
			sp.faces[end].at, sp.faces[end].actions = at, actions
		}
	}
	for i, s := range b.Supports {
		if s.Kind == statics.Free {
			continue
		}
		e, err := response.ReactionExtremes(i + 1)
		if err != nil {
			return Forces{}, err
		}
		r := Reaction{
			Support: i + 1, Most: e.ForceMost.Force, MostBy: e.ForceMost.ID, Least: e.ForceLeast.Force, LeastBy: e.ForceLeast.ID,
		}
		if s.Kind == statics.Fixed {
			m := e.MomentMost
			if m.Moment.Abs().Less(e.MomentLeast.Moment.Abs()) {
				m = e.MomentLeast
			}
			r.Moment, r.MomentBy = m.Moment.Abs(), m.ID
		}
		f.twistAt(&r, b.Spans)
		f.reactions = append(f.reactions, r)
	}
	return f, nil
}

// twistAt finds the torque that a support holds: what the spans on either side
// bring to it.
func (f *Forces) twistAt(r *Reaction, spans []units.Length) {
	for i := range f.Combinations() {
		var held units.Moment
		if r.Support <= len(f.spans) {
			held = f.Action(i, r.Support, units.Length{}, true).Torque
		}
		if k := r.Support - 1; k >= 1 {
			held = held.Sub(f.Action(i, k, spans[k-1], false).Torque)
		}
		if r.Torque.Less(held.Abs()) {
			r.Torque, r.TorqueBy = held.Abs(), f.spans[0].lines[i].ID()
		}
	}
}

// addTwists takes the torques among the loads, which the analysis of bending
// leaves out.
func (sp *spanForces) addTwists(loads []Load, span int, kept []Combination) {
	for i := range loads {
		l := &loads[i]
		if l.Shape != Torque && l.Shape != UniformTorque || l.Span != 0 && l.Span != span {
			continue
		}
		w := twist{at: l.At.In(units.Metre), torque: l.Moment.In(units.NewtonMetre), spread: l.Shape == UniformTorque, path: l.Path}
		for _, c := range kept {
			factor := 0.0
			for _, f := range c.Factors {
				if f.Case == l.Case {
					factor = f.Factor
				}
			}
			w.factors = append(w.factors, factor)
		}
		sp.twists = append(sp.twists, w)
		if !w.spread {
			sp.breaks = append(sp.breaks, l.At)
		}
	}
	slices.SortFunc(sp.breaks, units.Length.Compare)
	sp.breaks = slices.Compact(sp.breaks)
}
