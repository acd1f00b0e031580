// Package proof holds the tests that put designs and checks of the ACI 318
// editions to independent judges: ten thousand random briefs of every shape,
// with shear, torque and axial force, re-derived by package rederive check by
// check; the chosen layouts held against an enumeration of the declared space;
// and the properties that any design must have. It also sees that every trap
// that testdata/traps.json lists is watched by tests.
//
// By default 2,000 of the random briefs are run and 250 of the enumerations,
// with a share of those of flanges and torque; SOFFIT_FULL=1 runs 10,000 and
// 3,000.
package proof
