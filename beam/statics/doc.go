// Package statics finds the forces inside a straight beam: bending moment and
// shear along each span and the reactions, case by case, and the most and
// least of them over a set of combinations. It knows no design code, no
// section and no reinforcement; case and combination ids are the caller's own
// strings and are kept as given.
//
// # Scope
//
// A beam is a chain of prismatic spans between supports, one support more than
// spans, bending in one plane with small deflections and plane sections
// (Euler-Bernoulli). This version analyses one span; a beam of more spans is
// refused with a [SpanCountError]. Axial force is not modelled, so a roller and
// a pin hold a beam alike and a beam on two rollers is stable.
//
// # Signs
//
// Positions run from the left end of a span. Loads are positive downward.
// A couple is positive clockwise with x to the right: it raises the bending
// moment by its own amount where it acts. A sagging moment is positive. Shear
// is positive when the part to the left pushes up on the part to the right, so
// that dM/dx = V and dV/dx = -w. The force of a reaction is positive upward,
// and its moment is the couple that the support puts on the beam, positive
// clockwise like any other couple: under gravity it is negative at a fixed left
// end and positive at a fixed right end.
//
// # Exactness
//
// Nothing is sampled. Between neighbouring breakpoints the load is linear, the
// shear quadratic and the moment cubic, and a [Line] keeps those polynomials.
// End moments of statically indeterminate spans come from closed forms.
// Extremes lie at the roots of the derivative or at a jump. All arithmetic is
// float64; what differs by less than 1e-13 of the load (times the span length
// for moments) counts as equal where a first, a leftmost or a change of sign is
// to be told, and a force below it reads as zero, because rounding alone
// reaches that far.
//
// # Source
//
// The relations are those of elementary beam theory, as in R. C. Hibbeler,
// Structural Analysis, and the beam tables of the AISC Steel Construction
// Manual (Table 3-23) and of Roark's Formulas for Stress and Strain.
package statics
