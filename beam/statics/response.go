package statics

import (
	"errors"
	"fmt"
	"iter"
	"math"
	"slices"
	"strings"

	"soffit.example/units"
)

// A Response is what a beam answers to a list of cases or combinations: for
// each a [Line] along every span, and its reactions. [Analyze] gives the
// Response to the load cases and [Response.Combine] that to combinations of
// them. It does not change once made and may be read from several goroutines.
type Response struct {
	ids       []string
	index     map[string]int // of an id in ids
	spans     []Lines
	reactions []reaction // of each support under the first id, then under the next
}

// reaction is what a support puts on the beam, in N and N-m.
type reaction struct {
	force, moment float64
}

// A Factor multiplies a case, or whatever a [Response] has a line for.
type Factor struct {
	Case  string
	Value float64 // -1e6 to 1e6
}

// A Combination is a sum of factored cases. A case that it leaves out takes no
// part in it.
type Combination struct {
	ID      string
	Factors []Factor
}

// newResponse makes room for a line of each id over each span, given by its
// breakpoints, and for the reactions.
func newResponse(ids []string, index map[string]int, spans ...[]float64) (*Response, error) {
	total := 0
	for _, x := range spans {
		total += len(ids) * (len(x) - 1)
	}
	if total > MaxPieces {
		field := fmt.Sprintf("pieces of %d lines", len(ids))
		return nil, outside(field, units.None, float64(total), 1, MaxPieces)
	}
	r := &Response{
		ids: ids, index: index,
		spans:     make([]Lines, len(spans)),
		reactions: make([]reaction, len(ids)*(len(spans)+1)),
	}
	slab := make([]piece, total)
	for s, x := range spans {
		n := len(x) - 1
		lines := make([]Line, len(ids))
		for i, id := range ids {
			lines[i] = Line{id: id, x: x, pieces: slab[:n:n]}
			slab = slab[n:]
		}
		r.spans[s] = Lines{lines: lines, index: index}
	}
	return r, nil
}

// IDs yields the ids of the cases or combinations in their order.
func (r *Response) IDs() iter.Seq[string] { return slices.Values(r.ids) }

// Lines returns the lines along a span, counted from 1. The error is a
// [*RangeError] if the beam has no such span.
func (r *Response) Lines(span int) (*Lines, error) {
	if span < 1 || span > len(r.spans) {
		return nil, outside("span", units.None, float64(span), 1, float64(len(r.spans)))
	}
	return &r.spans[span-1], nil
}

// Combine returns the response to combinations of what r is a response to.
//
// The error joins every fault, each a [*RangeError] or a [*FieldError]: no
// combinations, an id that is empty or comes twice, a case that comes twice in a
// combination or that r has no line for, a factor out of range.
func (r *Response) Combine(combinations []Combination) (*Response, error) {
	ids := make([]string, len(combinations))
	index := make(map[string]int, len(combinations))
	for i, c := range combinations {
		ids[i] = c.ID
		if _, twice := index[c.ID]; !twice {
			index[c.ID] = i
		}
	}
	if faults := r.checkCombinations(combinations, index); faults != nil {
		return nil, errors.Join(faults...)
	}
	spans := make([][]float64, len(r.spans))
	for s := range spans {
		spans[s] = r.spans[s].first().x
	}
	sum, err := newResponse(ids, index, spans...)
	if err != nil {
		return nil, err
	}
	for i, c := range combinations {
		for _, f := range c.Factors {
			sum.addScaled(i, r, r.index[f.Case], f.Value)
		}
		for _, ls := range sum.spans {
			if !(ls.lines[i].mNoise <= maxNoise) {
				return nil, &FieldError{
					Field: fmt.Sprintf("combinations[%d]", i), Value: c.ID,
					Allowed: "factors that keep the forces below 1e33 N-m",
				}
			}
		}
	}
	return sum, nil
}

// maxNoise keeps sums of sums of cases far from the end of a float64's range.
const maxNoise = noise * 1e33

// addScaled adds f times q's line j to r's line i, and the reactions likewise.
func (r *Response) addScaled(i int, q *Response, j int, f float64) {
	for s := range r.spans {
		sum, term := &r.spans[s].lines[i], &q.spans[s].lines[j]
		for k := range sum.pieces {
			sum.pieces[k].addScaled(&term.pieces[k], f)
		}
		sum.vNoise += math.Abs(f) * term.vNoise
		sum.mNoise += math.Abs(f) * term.mNoise
	}
	to, from := r.reactionsOf(i), q.reactionsOf(j)
	for k := range to {
		to[k].force += f * from[k].force
		to[k].moment += f * from[k].moment
	}
}

// checkCombinations returns every fault of the combinations; index holds where
// each id comes first.
func (r *Response) checkCombinations(combinations []Combination, index map[string]int) []error {
	if len(r.ids) == 0 {
		return []error{&FieldError{Field: "response", Allowed: "one that Analyze or Combine returned"}}
	}
	if len(combinations) == 0 {
		return []error{outside("combinations", units.None, 0, 1, MaxPieces)}
	}
	var faults []error
	for i, c := range combinations {
		path := func(field string) string { return fmt.Sprintf("combinations[%d].%s", i, field) }
		if c.ID == "" {
			faults = append(faults, &FieldError{Field: path("id"), Allowed: "an id of its own"})
		} else if index[c.ID] != i {
			faults = append(faults, &FieldError{Field: path("id"), Value: c.ID, Allowed: "an id of its own"})
		}
		for j, f := range c.Factors {
			if _, known := r.index[f.Case]; !known {
				faults = append(faults, &FieldError{
					Field: path(fmt.Sprintf("factors[%d].case", j)), Value: f.Case, Allowed: listOf(r.ids),
				})
			}
			if slices.ContainsFunc(c.Factors[:j], func(g Factor) bool { return g.Case == f.Case }) {
				faults = append(faults, &FieldError{
					Field: path(fmt.Sprintf("factors[%d].case", j)), Value: f.Case, Allowed: "each case once",
				})
			}
			if !(math.Abs(f.Value) <= maxFactor) {
				faults = append(faults, outside(path(fmt.Sprintf("factors[%d].value", j)), units.None, f.Value, -maxFactor, maxFactor))
			}
		}
	}
	return faults
}

// listOf writes the first few ids for an error.
func listOf(ids []string) string {
	const few = 10
	if len(ids) > few {
		return fmt.Sprintf("%s and %d more", strings.Join(ids[:few], ", "), len(ids)-few)
	}
	return strings.Join(ids, ", ")
}

// Lines are the lines of one [Response] along one span.
type Lines struct {
	lines []Line
	index map[string]int
}

// All yields the lines in the order of their cases or combinations, counted
// from zero. Going through them allocates nothing.
func (ls *Lines) All() iter.Seq2[int, *Line] {
	return func(yield func(int, *Line) bool) {
		for i := range ls.lines {
			if !yield(i, &ls.lines[i]) {
				return
			}
		}
	}
}

// Line returns the line of a case or combination. The error is a [*FieldError]
// if there is none.
func (ls *Lines) Line(id string) (*Line, error) {
	i, known := ls.index[id]
	if !known {
		ids := make([]string, len(ls.lines))
		for i := range ls.lines {
			ids[i] = ls.lines[i].id
		}
		return nil, &FieldError{Field: "id", Value: id, Allowed: listOf(ids)}
	}
	return &ls.lines[i], nil
}

// first is the first line, or an empty one.
func (ls *Lines) first() *Line {
	if len(ls.lines) == 0 {
		return new(Line)
	}
	return &ls.lines[0]
}

// Length is the length of the span.
func (ls *Lines) Length() units.Length { return ls.first().Length() }

// AppendBreaks appends to dst the breakpoints that the lines share, from left to
// right: the ends of the span and every place where a load begins, ends or acts.
func (ls *Lines) AppendBreaks(dst []units.Length) []units.Length {
	for _, x := range ls.first().x {
		dst = append(dst, units.Metre.Of(x))
	}
	return dst
}

// Extremes returns the extremes of all lines over the closed length between two
// places of the span: their envelope there. Of equal extremes that of the first
// line is given. See [Line.Extremes] for jumps and errors.
func (ls *Lines) Extremes(from, to units.Length) (Extremes, error) {
	a, b, err := stretch(from, to, ls.first().length())
	if err != nil {
		return Extremes{}, err
	}
	var p peaks
	for i := range ls.lines {
		ls.lines[i].scan(a, b, &p)
	}
	return p.extremes(), nil
}
