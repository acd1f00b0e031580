// Package bars knows reinforcing bars as a bar bender and a steel fixer know
// them: which sizes a catalog offers, how a size is bent, and where bars lie
// inside a stirrup.
//
// # Catalogs
//
// A [Catalog] is a table of standard sizes with its grades and its bend and
// hook rules, embedded as a data file that names its source and says what was
// entered from memory. [Lookup] finds one by id; [ParseCatalog] reads a
// catalog of your own in the same form. Nominal diameters, areas and masses
// keep the text that the standard prints. Areas of several bars are summed
// exactly: 4 bars of 1.27 in2 are 5.08 in2, not 5.08 and some noise.
//
// # Fit
//
// A [Cage] is the stirrup in its form. [Cage.Fit] lays layers of bars in it
// and answers by coordinates: x from the left face, y from the face at which
// the bars lie (the soffit for bottom bars, the top for top bars, seen
// mirrored). Clear gaps are measured between the coordinates, never taken
// from a formula for the common case, so mixed sizes and corner bars pushed
// into the bend of the stirrup are covered by the same code. What gap is
// required belongs to a design code and comes in as a [Clearances] value.
//
// A bar has its nominal diameter throughout; the ribs' extra is available as
// [Size.Overall] but enters no distance. Inner legs of stirrups with more
// than two legs are taken to run beside the bars and obstruct nothing.
//
// A [Bundle] of two to four bars in contact counts as one bar of the same
// area, but takes the room of its real bars: these touch the stirrup, and
// clear distances are measured between them.
//
// [Cage.AppendLegs] tells where the legs of a stirrup stand, [Cage.Centreline]
// and [Cage.Enclosed] what a closed one encloses.
//
// # Lengths
//
// [Closed], [Open] and [CrossTie] give cut lengths along the centre line of
// the bar with its bends as arcs, from out-to-out dimensions; a [StirrupSet]
// may also be inclined. [Incline] gives the length of a stretch bent up.
//
// Lengths are float64 metres inside. Limits met exactly are met: comparisons
// have the 1e-9 relative tolerance of units.AtMost. All functions are safe for
// concurrent use; nothing depends on clock, chance or environment.
package bars
