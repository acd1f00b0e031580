// Package secondcode is a small design code made up to show that the model
// takes any code: it stands on the same interface as the real ones and on
// nothing else of theirs, and no file outside this directory knows of it.
//
// It differs from the ACI 318 family wherever the model could have leaned on
// that family by accident: partial factors on materials instead of strength
// reduction factors, another stress block and crushing strain, EN 10080 bars,
// a limit on the neutral axis instead of on strain, a lever arm of 0.9 d in
// shear, no shear left to the concrete once stirrups are counted, and its own
// gaps, covers, spacings and load combinations.
//
// Its rules are invented. It is for tests and is no basis for a design.
package secondcode
