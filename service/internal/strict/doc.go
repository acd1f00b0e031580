// Package strict reads JSON requests into Go structs without guessing, and
// reports everything that is wrong with a document at once.
//
// Reading has three steps. A walk over the tokens of the document, driven by
// the Go type it is for, finds every unknown, missing, null, misplaced or
// unreadable member, with its pointer, and bounds the work. What passed the
// walk is decoded. The ranges in `validate` tags are checked last.
//
// A struct field is required unless its json tag says omitzero. Types that
// have an UnmarshalJSON method are asked to read their own values; their
// errors are clauses without a subject ("needs a unit"), to which the walk
// puts the member's name.
package strict
