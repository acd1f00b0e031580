package strict

import (
	"fmt"
	"strings"
)

// A Fault is one thing wrong with a document.
type Fault struct {
	Path    string `json:"pointer"`          // RFC 6901 pointer to the member; empty: the whole document
	Detail  string `json:"detail"`           // what is wrong, with the value and its unit
	Allowed string `json:"allowed,omitzero"` // what would be accepted
}

// Faults collects faults in the order they are found. Of faults at one place,
// or inside a value that has one already, only the first is kept: the others
// follow from it. The zero value keeps none.
type Faults struct {
	Most     int // listed; further ones are counted
	list     []Fault
	unlisted int
}

// Add adds a fault.
func (f *Faults) Add(fault Fault) {
	for _, g := range f.list {
		// What holds a faulty member, or stands in one, tells nothing new.
		if inside(fault.Path, g.Path) || fault.Path != "" && inside(g.Path, fault.Path) {
			return
		}
	}
	if len(f.list) >= f.Most {
		f.unlisted++
		return
	}
	f.list = append(f.list, fault)
}

// inside reports whether the pointer p names what q names, or a part of it.
func inside(p, q string) bool {
	rest, ok := strings.CutPrefix(p, q)
	return ok && (rest == "" || rest[0] == '/')
}

// count is the number of faults found, listed or not.
func (f *Faults) count() int { return len(f.list) + f.unlisted }

// full reports whether further faults are counted only.
func (f *Faults) full() bool { return len(f.list) >= f.Most }

// None reports whether nothing was found.
func (f *Faults) None() bool { return f.count() == 0 }

// All lists the faults; where some were left out, the last entry says how
// many.
func (f *Faults) All() []Fault {
	if f.unlisted == 0 {
		return f.list
	}
	return append(f.list[:len(f.list):len(f.list)], Fault{
		Detail: fmt.Sprintf("%d further faults are not listed", f.unlisted),
	})
}

// A SyntaxError says that a document is not JSON, or is JSON that no request
// can be: a member twice, nested too deep, too many values.
type SyntaxError struct {
	Path   string // pointer to where reading stopped; may be empty
	Offset int64  // in bytes
	Reason string
}

func (e *SyntaxError) Error() string { return e.Reason }
