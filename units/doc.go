// Package units holds the physical quantities of beam design as types, reads
// them from text and JSON, and prints them.
//
// # Quantities
//
// Each quantity is an opaque type: [Length], [Force], [Stress], [Moment] and so
// on. A unit makes one from a number and a quantity gives its number in a unit:
//
//	depth := units.Inch.Of(23.5)
//	mm := depth.In(units.Millimetre)
//
// Quantities of one type add, compare and scale by methods. Products and
// quotients of different types are methods too, and their result is the type
// that physics says: [Stress.MulArea] is a Force, [Force.MulLength] a Moment.
// Operators, bare numbers, conversions between types and units of another
// quantity do not compile. Ratios, strains and angles are plain float64.
//
// The zero value of a quantity is zero. Quantities are comparable and may be
// map keys. Nothing here panics; a number that overflowed, or a unit value
// that names no unit, makes a quantity whose IsFinite is false.
//
// An [Amount] is a quantity whose dimension is known only at run time. A
// [System] picks the unit that each dimension is printed in.
//
// # Exactness
//
// A quantity is a float64 in its SI unit. Factors are constants from exact
// definitions: the international yard and pound of 1959 and standard gravity,
// as listed in NIST Special Publication 811 (2008), appendix B; [Table] gives
// each factor exactly as text. Of multiplies by the factor and In divides by
// it, never by a rounded inverse, so that each rounds at most twice: once for
// the factor, once for the operation. In the SI unit both are exact.
//
// Text is read as the float64 nearest to the number written, then multiplied
// by the factor, so ParseLength("24 in") equals Inch.Of(24). Printing rounds
// to 12 significant digits: text of up to 12 digits comes back unchanged from
// any unit, where the shortest float64 would turn 0.75 in into
// 0.7499999999999999 in. MarshalText and MarshalJSON instead write the SI
// value with every digit it needs, and read back bit by bit.
//
// A comparison with a limit goes through [AtMost] or the method of that name,
// which let a limit be met exactly despite binary rounding.
//
// # Text and JSON
//
// Text is a number and a unit: "24 in", "3/4 in", "1 1/2 in", "1.5e3 psi", and
// for lengths "26 ft 6 in" (a sign in front holds for both parts). The units of
// a dimension are a closed list, written as the trade does and case-sensitive.
// At most 64 bytes of ASCII are read, numbers of at most 40 characters, and
// magnitudes from 1e-30 to 1e30 in the unit given and in the SI unit. In JSON a
// quantity is {"value": 24, "unit": "in"} or the string; a bare number is
// refused, since its unit would be a guess. Faults are a *[ParseError].
//
// # What types cannot catch
//
// A type tells dimension and kind, not meaning. Stress and area load, density
// and unit weight, force and mass, volume and section modulus are kept apart,
// although the symbols kPa, lb/ft3, lb and in3 are each of two of them: the
// symbol is read as what the place asks for. Not kept apart are
//
//   - a bending moment, a torque, a couple and (were it ever needed) an energy;
//   - a stress, a strength and a modulus of elasticity;
//   - a section modulus and a first moment of area;
//   - a position, a size and a displacement, or from which face it is measured;
//   - areas of steel and of concrete, axial and shear forces;
//   - factored and unfactored values, and signs;
//   - two arguments of one type that are swapped, such as width and depth.
//
// Empirical formulas, such as the square root of a strength that yields a
// stress, have no dimension that a type could check: they unwrap their
// arguments into the units that their source is written in.
package units
