// Package beam designs and checks reinforced-concrete beams under a design
// code handed in as a value.
//
// The flow is one way:
//
//	Brief -> Problem (resolved, admitted, analysed) -> Trial (bars by
//	coordinates) -> the code's checks -> Result
//
// [Design] proposes layouts and keeps the best that passes; [CheckLayout] judges
// a layout that already exists. Both put every layout through the same check
// functions of the [Code], so a design never passes a check that
// checking its layout would fail.
//
// The package holds no number that belongs to a design code: factors, limits
// and stress blocks come from the Code. A second code is a second value that
// satisfies the interface and touches nothing here.
//
// Signs: sagging moment is positive; shear is positive when the part to the
// left pushes up; axial compression is positive. Positions along a span run
// from the centre of its left support; depths run down from the top face.
//
// Results are a calculation aid for qualified engineers. They defer to the
// locally adopted code and to the licensed engineer who seals the work.
package beam
