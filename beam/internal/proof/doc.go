// Package proof holds the tests that put designs and checks of the ACI 318
// editions to independent judges: ten thousand random briefs re-derived by
// package rederive, the chosen layouts held against an enumeration of the
// declared space, and the properties that any design must have.
//
// By default 2,000 of the random briefs are run and 500 of the enumerations;
// SOFFIT_FULL=1 runs 10,000 and 3,000.
package proof
