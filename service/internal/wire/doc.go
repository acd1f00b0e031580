// Package wire holds the types of the JSON door: what requests and replies
// look like, and nothing of what they mean.
//
// Request fields are required unless their json tag says omitzero. Ranges
// that do not depend on anything else are in `validate` tags; `doc` tags are
// the descriptions of the OpenAPI document, which is generated from these
// types. Quantities of requests are typed, so that a value of the wrong
// dimension never gets further; quantities of replies are [units.Measure], in
// the units that the request asked for.
package wire
