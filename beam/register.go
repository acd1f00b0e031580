package beam

import "slices"

// Assumption is something taken for granted on the way to a result, and what
// the finished design found.
type Assumption struct {
	ID      string   // stable, dotted: "self-weight.section"
	Assumed string   // in words, with the value
	UsedIn  []string // ids of the checks that rest on it
	Found   string   // what the finished design shows; empty where nothing in the input can tell
	Holds   bool
	// Open says that nothing in the input can confirm it: it stays the
	// engineer's to confirm, and is repeated among the cautions.
	Open bool
	// Decisive says that a verdict cannot stand if it does not hold.
	Decisive bool
}

// Register collects assumptions in the order they are made. The zero value
// is ready to use.
type Register struct{ list []Assumption }

// Assume adds an assumption, or replaces the one with the same id.
func (r *Register) Assume(a Assumption) {
	for i := range r.list {
		if r.list[i].ID == a.ID {
			r.list[i] = a
			return
		}
	}
	r.list = append(r.list, a)
}

// Settle writes what was found beside an assumption made earlier; unknown
// ids are ignored.
func (r *Register) Settle(id, found string, holds bool) {
	for i := range r.list {
		if r.list[i].ID == id {
			r.list[i].Found, r.list[i].Holds, r.list[i].Open = found, holds, false
			return
		}
	}
}

// All lists the assumptions in the order they were made.
func (r *Register) All() []Assumption { return r.list }

func (r *Register) clone() Register { return Register{list: slices.Clone(r.list)} }
