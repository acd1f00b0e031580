package beam

import (
	"fmt"
	"strings"
)

// Fault is one thing wrong with an input. Path is a JSON pointer in the
// words of the JSON door ("/section/width"), so that a program can find the
// field whichever way the brief came in.
type Fault struct {
	Path    string
	Detail  string // what is wrong, with the value and its unit
	Allowed string // the range or the list that would be accepted; may be empty
}

func (f Fault) String() string {
	s := f.Path + ": " + f.Detail
	if f.Allowed != "" {
		s += " (allowed: " + f.Allowed + ")"
	}
	return s
}

// InputError reports every fault of an input at once.
type InputError struct{ Faults []Fault }

func (e *InputError) Error() string {
	if len(e.Faults) == 1 {
		return "beam: " + e.Faults[0].String()
	}
	var b strings.Builder
	fmt.Fprintf(&b, "beam: %d faults", len(e.Faults))
	for _, f := range e.Faults {
		b.WriteString("\n\t")
		b.WriteString(f.String())
	}
	return b.String()
}
