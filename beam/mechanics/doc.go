// Package mechanics holds the mechanics of a reinforced-concrete cross-section
// in bending, and nothing of any design code: no limit, no factor, no rule.
//
// A [Section] is a stack of rectangles and trapezoids of concrete, hence any
// polygon by its widths, and layers of steel. How concrete answers strain is a
// [Law], passed in as a value: a rectangular block, a parabola and rectangle, a
// bilinear line, a polyline or any curve. Plane sections remain plane; steel is
// elastic and perfectly plastic; bond is perfect.
//
//   - [Section.Ultimate] and [Solver.Ultimate] find the equilibrium at which
//     the compression face reaches the law's ultimate strain.
//   - [Solver.MomentCurvature] and [Solver.AtCurvature] find the equilibria on the
//     way there, each under the law cut off at a strain, [Law.Truncated].
//   - [Section.Fibres] finds the same equilibrium by another route, fibre
//     integration, and shares nothing with the first but the law and the
//     validation of input.
//   - [Section.Gross], [Section.Uncracked] and [Section.Cracked] are the elastic
//     properties used in service.
//   - [RequiredTension], [Solver.RequiredTension], [Solver.RequiredBoth] and
//     [Solver.RequiredArea] turn the question round: of a rectangle, of any shape,
//     with compression steel, and of one layer among others.
//
// # Signs and datums
//
// A section is described from its top face down, for either sense of bending.
// Results are measured from the compression face, which is the top face in
// [Sagging] and the bottom face in [Hogging]. Strains, stresses and forces are
// positive in compression. The exceptions say so: [Ultimate.ExtremeStrain] and
// [Cracked.SteelStress] are positive in tension.
//
// # Exactness
//
// Every law is kept as pieces of polynomials, so between the curvatures at which
// a bar yields, or a bar or an edge of the concrete passes from one piece to the
// next, the balance of forces is itself a polynomial of low degree, of trapezoids
// one higher than of rectangles, and at most the fifth. Its roots are isolated by
// counting sign changes, never by sampling, hence none is missed, and are refined
// to the last bits of float64. A curve that is no polynomial is fitted when the law
// is made, within 1e-9 of its greatest stress.
//
// Values are SI float64 inside; a solution that fits a closed form agrees with
// it within 1e-12.
package mechanics
