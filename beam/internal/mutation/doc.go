// Package mutation measures how well the tests of a package hold its code: it
// makes small changes to the code, one at a time, and asks whether a test
// fails. Run it on demand, from anywhere in the module:
//
//	go run ./beam/internal/mutation/mutate -pkg ./beam/mechanics
//	go run ./beam/internal/mutation/mutate -pkg ./beam/aci318 -files 'cover|spacing'
//	go run ./beam/internal/mutation/mutate -pkg ./beam/aci318 -sample 200 -seed 7
//	go run ./beam/internal/mutation/mutate -pkg ./beam/aci318 -list
//
// # How it works
//
// All mutants of a package are compiled at once. Each place that can be changed
// is rewritten into a call that takes the number of its mutants and does what
// the code did, unless the number is that of the one mutant switched on by an
// environment variable: a < b becomes mutationLess(41, a, b), which under
// mutant 41 is a <= b. The rewritten files replace the real ones in an overlay
// of the build, in a temporary directory; the source tree is not touched.
// Initialisers of package variables are rewritten like all other code, so
// that tables of coefficients are mutated too.
//
// The test binary is first run once for each top-level test, which is timed
// and notes the places that it reaches. A mutant in a place that no test
// reaches is not covered, without being run. Every other mutant is run
// with the tests that reach it alone, the quick ones before the slow ones, and
// stops at the first that fails. Tests run short. Property tests of
// pgregory.net/rapid first make few checks, from a fixed seed; what survives
// meets them with all, in a second round that -quick leaves out.
// A run that lasts much longer than it should, or takes a gibibyte, is
// stopped and counts as killed.
//
// # The mutants
//
//   - < <= > >= shift their boundary and are negated; == and != are negated.
//     So are the methods Less and AtMost of quantities, and units.AtMost.
//   - + and -, * and / change places, also as += and the like, and as the
//     methods Add, Sub, Mul and Div; a remainder becomes a product; a minus
//     sign is dropped.
//   - min and max change places: builtin, of math, and as methods.
//   - && and || change places; conditions of if, for and switch and returned
//     booleans are negated; ! is dropped.
//   - Integer constants grow by one; others by a hundredth of their value and
//     a millionth, 0 to 1. Constants of named types, which enumerate, stay; so
//     do constant indexes and capacities.
//   - Assignments, increments and calls that stand as statements are left out.
//
// # Reading the report
//
// The kill rate is killed over all, where what was not covered counts as
// survived. A survivor is either a test that is missing or an equivalent: a
// change that no test could see. No mark in the code excludes anything; the file
// equivalents.txt says of a survivor why it cannot be killed, and the report
// sets those it explains apart, without counting them as killed.
package mutation
