// Package proof holds the tests that put designs and checks of the ACI 318
// editions to independent judges: ten thousand random briefs re-derived by
// package rederive, the chosen layouts held against an enumeration of the
// declared space, and the properties that any design must have.
//
// By default a fifth of the random briefs is run; SOFFIT_FULL=1 runs all of
// them.
package proof
