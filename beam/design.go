package beam

import (
	"context"
	"fmt"
	"math"
	"slices"

	"soffit.example/units"
)

// Design finds bars and stirrups for a brief under a code.
//
// It resolves and analyses the brief, refuses what the code's scope rules
// exclude, searches the layouts that the brief's preferences allow, and
// returns the best of those that pass every check, with alternatives, with
// every arrangement that was rejected and why, and with every assumption
// settled against the finished design. Where nothing passes the verdict is
// Unsatisfied, the layout is the one that came closest, and Cures lists
// changes of the brief that were designed in turn and found to pass.
//
// The error is an *InputError that lists every fault of the brief, or the
// context's. A beam that fails or lies out of scope is no error.
func Design(ctx context.Context, code Code, brief Brief) (*Result, error) {
	r, err := design(ctx, code, brief, false)
	if err != nil || r.Verdict != Unsatisfied || brief.Preferences.NoCures {
		return r, err
	}
	r.Cures, err = cures(ctx, code, brief, r)
	if err != nil {
		return nil, err
	}
	if len(r.Cures) == 0 {
		r.Cautions = append(r.Cautions, "No single change of depth, width, concrete strength or stirrup legs, up to about twice, was found to make the beam pass.")
	}
	return r, nil
}

// CheckLayout judges a layout under a brief and a code with the same checks
// that Design uses. Errors are those of Design; faults of the layout have
// paths under /layout.
func CheckLayout(ctx context.Context, code Code, brief Brief, layout Layout) (*Result, error) {
	if err := ctx.Err(); err != nil {
		return nil, err
	}
	p, err := prepare(code, brief)
	if err != nil {
		return nil, err
	}
	if len(p.refusals) > 0 {
		return p.outOfScope(), nil
	}
	return p.finish(layout)
}

// design is Design without the cures. With any it takes the first layout that
// passes for the best.
func design(ctx context.Context, code Code, brief Brief, any bool) (*Result, error) {
	first, err := prepare(code, brief)
	if err != nil {
		return nil, err
	}
	first.any = any
	best, err := searchDepths(ctx, first)
	if err != nil {
		return nil, err
	}
	if best == nil {
		return first.outOfScope(), nil
	}
	return best.result()
}

// searchDepths searches the brief's section and then the other depths that
// its preferences allow. It returns nil if a scope rule refuses every depth.
func searchDepths(ctx context.Context, first *prepared) (*search, error) {
	depths := []units.Length{first.Brief.Section.Depth}
	for _, d := range first.Brief.Preferences.Depths {
		if !slices.Contains(depths, d) {
			depths = append(depths, d)
		}
	}
	if first.Brief.Preferences.Prefer == Shallowest {
		slices.SortFunc(depths, units.Length.Compare)
	}
	var best *search
	for _, d := range depths {
		if err := ctx.Err(); err != nil {
			return nil, err
		}
		p := first
		if d != first.Brief.Section.Depth {
			var err error
			if p, err = first.atDepth(d); err != nil {
				return nil, err
			}
		}
		if len(p.refusals) > 0 {
			continue
		}
		s := newSearch(p, 1+p.Brief.Preferences.KeepBest)
		if err := s.run(ctx); err != nil {
			return nil, err
		}
		if len(s.kept) > 0 {
			s.first = s.layoutOf(&s.kept[0])
			s.whole = s.addSideBars(&s.first)
		}
		if best == nil || s.better(best) {
			s.rejects.absorb(best)
			best = s
		} else {
			best.rejects.absorb(s)
		}
		if p.Brief.Preferences.Prefer == Shallowest && best.whole {
			break
		}
	}
	return best, nil
}

// absorb takes over what another search rejected.
func (l *rejectLog) absorb(s *search) {
	if s != nil {
		l.list = append(l.list, s.rejects.list...)
	}
}

// better reports whether the first layout of s ranks before that of t. A
// depth at which the member as a whole fails comes after those at which it
// passes.
func (s *search) better(t *search) bool {
	switch {
	case len(s.kept) == 0:
		return false
	case len(t.kept) == 0:
		return true
	case s.whole != t.whole:
		return s.whole
	}
	return slices.Compare(s.kept[0].key[:], t.kept[0].key[:]) < 0
}

// result finishes the best layout of the search, or the closest one where
// nothing passed.
func (s *search) result() (*Result, error) {
	var chosen *found
	layout := s.first
	if len(s.kept) > 0 {
		chosen = &s.kept[0]
	} else if chosen = s.closest(); chosen != nil {
		layout = s.layoutOf(chosen)
		s.addSideBars(&layout)
	}
	if chosen != nil {
		s.assumeDepths(chosen)
	}
	r, err := s.p.finish(layout)
	if err != nil {
		// %v, not %w: it is no fault of the brief.
		return nil, fmt.Errorf("beam: the layout that was found: %v", err)
	}
	if len(s.kept) == 0 {
		// Side bars that the brief counts in bending are added last, and may
		// make the closest layout pass: finish has the last word.
		s.rejectClosest(chosen)
		r.Rejected = s.rejects.list
		return r, nil
	}
	s.retrace(chosen)
	r.Rejected = s.rejects.list
	for i := 1; i < len(s.kept); i++ {
		if a, ok := s.alternative(&s.kept[i]); ok {
			r.Alternatives = append(r.Alternatives, a)
		}
	}
	return r, nil
}

// rejectClosest logs the closest arrangement where the search saw none worth
// trying, so that the reasons are not missing where they are most wanted.
func (s *search) rejectClosest(f *found) {
	if f == nil || len(s.rejects.list) > 0 {
		return
	}
	if !s.layPair(f.stirrup, &f.bottom, &f.top, f.inCompress) {
		return
	}
	for face, set := range [...]*barSet{Bottom: &f.bottom, Top: &f.top} {
		if set != nil && !s.judge(Face(face), Fitting, Bending) {
			s.reject(s.arrangement(Face(face), set, f.stirrup.Name))
		}
	}
}

// retrace repeats the search for the stirrups of the chosen bars, to log
// every arrangement that failed on the way. The log of each pair of bars
// would say the same many times over.
func (s *search) retrace(f *found) {
	s.logs = true
	if s.layPair(f.stirrup, &f.bottom, &f.top, f.inCompress) {
		s.leastStirrups(f.stirrup, s.tensionDepth())
		s.eachStirrup(f.stirrup, func(float64) bool { return true }, func([]Zone, float64) {})
	}
	s.logs = false
}

// assumeDepths lists the effective depths that the search sized tension
// steel with before any bar was laid: one layer of the size that was chosen.
// The finished bars have depths of their own, by which every check goes.
func (s *search) assumeDepths(f *found) {
	for sense, set := range [...]*barSet{Positive: &f.bottom, Negative: &f.top} {
		if sense := Sense(sense); set == nil || !s.bent(sense) {
			continue
		}
		size, sense := set.largest(), Sense(sense)
		s.t.enclose(f.stirrup, size)
		d := s.singleLayerDepth(f.stirrup, size)
		s.p.assumedDepth[sense] = d
		s.p.register.Assume(Assumption{
			ID:      "effective-depth." + sense.String(),
			Assumed: fmt.Sprintf("d = %s: one layer of %s in %s stirrups", s.p.System.Format(d.Amount()), size.Name, f.stirrup.Name),
			UsedIn:  []string{"the least tension steel that the search tried"},
		})
	}
}

// closest is the arrangement that came nearest to passing; nil if there was
// nothing to try at all.
func (s *search) closest() *found {
	if s.near[0].ok {
		return &s.near[0].pair
	}
	if len(s.main) == 0 || len(s.ties) == 0 {
		return nil
	}
	f := &found{stirrup: s.ties[0]}
	for _, face := range [2]Face{Bottom, Top} {
		set := &s.near[face].set
		if !s.near[face].ok {
			set = s.fullest(face)
		}
		if face == Bottom {
			f.bottom = *set
		} else {
			f.top = *set
		}
	}
	s.t.enclose(f.stirrup, f.bottom.largest(), f.top.largest())
	s.setUniform(f.stirrup, 2, s.closestSteps(f.stirrup))
	f.zones = slices.Clone(s.zones)
	return f
}

// fullest is the set with the most steel that the layers of a face hold, for
// a face where the code saw no set worth trying; two bars where none fit.
func (s *search) fullest(face Face) *barSet {
	var best *barSet
	for i := range s.main {
		size := &s.main[i]
		most, _, _ := s.bounds(tensionSense(face), s.ties[0], size)
		n := 2
		if s.bent(tensionSense(face)) {
			n = max(most, 2)
		}
		for _, b := range uniformSets(nil, size, n, n, 1) {
			if best == nil || best.area.Less(b.area) && n > 2 {
				best = &b
			}
		}
	}
	return best
}

// sideBarsMost is the most side-face bars a side that the search adds.
const sideBarsMost = 30

// addSideBars adds the fewest bars along the side faces with which no more
// checks of the member as a whole fail than must: from the bottom bars to
// mid-depth, or over the whole height of a beam that hogs or is twisted, whose
// side bars may be of any size, the lightest that do. It reports whether none
// fails.
func (s *search) addSideBars(l *Layout) (passes bool) {
	t, faults := trialOf(s.p.Problem, l)
	if len(faults) > 0 || t.Bottom.Count == 0 || t.Top.Count == 0 {
		return false
	}
	fewest := s.wholeFails(t)
	if fewest == 0 {
		return true
	}
	sizes := s.main[:1]
	reach := t.Brief.Section.Depth.Scale(0.5)
	if s.bent(Negative) || t.Twisted {
		reach = t.Brief.Section.Depth.Sub(t.Top.Farthest)
	}
	if t.Twisted {
		sizes = s.main
	}
	reach = reach.Sub(t.Bottom.Farthest)
	var best SideSteel
	lightest := math.Inf(1)
	for i := range sizes {
		size := &sizes[i]
		one := size.MassPerLength.In(units.KilogramPerMetre)
		for n := 1; n <= sideBarsMost && (fewest > 0 || one*float64(n) < lightest); n++ {
			t.Side = SideSteel{Size: *size, Each: n, Spacing: reach.Scale(1 / float64(n+1)), Yield: t.Brief.Reinforcement.Yield, TensionFace: Bottom}
			fails := s.wholeFails(t)
			if fails < fewest || fails == fewest && best.Each > 0 && one*float64(n) < lightest {
				best, fewest, lightest = t.Side, fails, one*float64(n)
			}
			if fails == 0 {
				break
			}
		}
	}
	if best.Each > 0 {
		l.Longitudinal = append(l.Longitudinal, Row{
			Mark: "F1", Bar: best.Size.Name, Count: best.Each, Face: Side, Spacing: best.Spacing,
			To: l.Longitudinal[0].To, Start: "straight", End: "straight",
		})
	}
	return fewest == 0
}

// wholeFails counts the failing checks of the member as a whole.
func (s *search) wholeFails(t *Trial) (n int) {
	s.checks = s.p.Code.Judge(t.appendSideGeometry(s.checks[:0]), Whole, t)
	for i := range s.checks {
		if s.checks[i].Outcome == Fail {
			n++
		}
	}
	return n
}

// alternative says how a kept layout differs from the first. ok is false
// where a check of the member as a whole fails, which the search leaves to
// the end.
func (s *search) alternative(f *found) (a Alternative, ok bool) {
	a = Alternative{Layout: s.layoutOf(f), SteelMass: units.Kilogram.Of(f.mass * s.p.unitShare()), Depth: s.p.Brief.Section.Depth, WhyNotFirst: s.whyNotFirst(f)}
	s.addSideBars(&a.Layout)
	t, faults := trialOf(s.p.Problem, &a.Layout)
	if len(faults) > 0 {
		return a, false
	}
	s.checks = t.appendChecks(s.checks[:0])
	if g := Governing(s.checks); g != nil {
		a.Governing, a.Utilization = g.ID, g.Utilization
	}
	return a, !Failing(s.checks)
}

// whyNotFirst compares a kept layout with the first in the terms that rank.
func (s *search) whyNotFirst(f *found) string {
	first := &s.kept[0]
	if more := f.key[0] - first.key[0]; more > 0 {
		switch s.prefer {
		case FewestBars:
			return fmt.Sprintf("%g bars more", more)
		case OneSize:
			return fmt.Sprintf("%g sizes instead of %g", f.key[0], first.key[0])
		case FewestMarks:
			return fmt.Sprintf("%g marks more", more)
		}
	}
	what := "other bottom bars"
	switch {
	case f.bottom.barPlan == first.bottom.barPlan && f.top.barPlan == first.top.barPlan:
		what = "other stirrups"
	case f.bottom.barPlan == first.bottom.barPlan:
		what = "other top bars"
	}
	more := units.Kilogram.Of(f.mass - first.mass)
	percent := 100 * (f.mass - first.mass) / first.mass
	sys := s.p.System
	if !s.member {
		return fmt.Sprintf("%s: %.1f %% more steel", what, percent)
	}
	return fmt.Sprintf("%s: %.3g %s more steel (%.1f %%)", what, sys.Float(more.Amount()), sys.Unit(units.DimMass), percent)
}
