package statics

import "soffit.example/units"

// A Reaction is what a support puts on the beam.
type Reaction struct {
	ID     string       // the case or combination
	Force  units.Force  // positive upward
	Moment units.Moment // a couple, positive clockwise; zero at a support that lets the beam turn
}

// ReactionExtremes are the greatest and least reactions of one support, each
// with its case or combination and the other part acting with it. Least is the
// most negative, which for the force is the greatest uplift.
type ReactionExtremes struct {
	ForceMost, ForceLeast   Reaction
	MomentMost, MomentLeast Reaction
}

// reactionsOf returns the reactions under line i, one a support.
func (r *Response) reactionsOf(i int) []reaction {
	n := len(r.spans) + 1
	return r.reactions[i*n : (i+1)*n]
}

// Reactions returns the reactions of every support, left to right, under a case
// or combination. The error is a [*FieldError] if r has none of that id.
func (r *Response) Reactions(id string) ([]Reaction, error) {
	i, known := r.index[id]
	if !known {
		return nil, &FieldError{Field: "id", Value: id, Allowed: listOf(r.ids)}
	}
	out := make([]Reaction, len(r.spans)+1)
	for s := range out {
		out[s] = r.reaction(i, s)
	}
	return out, nil
}

// ReactionExtremes returns the extremes of the reactions of a support, counted
// from 1, over all cases or combinations of r. Of equals the first is given. The
// error is a [*RangeError] if the beam has no such support.
func (r *Response) ReactionExtremes(support int) (ReactionExtremes, error) {
	if n := len(r.spans) + 1; support < 1 || support > n || len(r.ids) == 0 {
		return ReactionExtremes{}, outside("support", units.None, float64(support), 1, float64(n))
	}
	first := r.reaction(0, support-1)
	e := ReactionExtremes{first, first, first, first}
	for i := 1; i < len(r.ids); i++ {
		c := r.reaction(i, support-1)
		if e.ForceMost.Force.Less(c.Force) {
			e.ForceMost = c
		}
		if c.Force.Less(e.ForceLeast.Force) {
			e.ForceLeast = c
		}
		if e.MomentMost.Moment.Less(c.Moment) {
			e.MomentMost = c
		}
		if c.Moment.Less(e.MomentLeast.Moment) {
			e.MomentLeast = c
		}
	}
	return e, nil
}

// reaction is that of support s under line i, without what rounding alone could
// have left.
func (r *Response) reaction(i, s int) Reaction {
	beside := &r.spans[max(s-1, 0)].lines[i]
	v := r.reactionsOf(i)[s]
	return Reaction{
		ID:     r.ids[i],
		Force:  units.Newton.Of(flush(v.force, beside.vNoise)),
		Moment: units.NewtonMetre.Of(flush(v.moment, beside.mNoise)),
	}
}
