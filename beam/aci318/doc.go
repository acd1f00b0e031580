// Package aci318 judges reinforced-concrete beams by ACI 318-14, ACI 318-19
// and their metric companions 318M-14 and 318M-19.
//
// One set of formula files serves the four editions; what differs is data.
// Each topic file holds the coefficients of its clauses as printed in each
// edition (the M editions carry their own rounded numbers, not conversions)
// next to the formulas that use them. A formula unwraps its quantities once
// into the units its clause is written in: in., lb, psi or mm, N, MPa.
//
// Clause numbers are those of the edition that judges; where the editions
// number a clause differently both numbers are data too.
//
// Covered are bending, one-way shear and torsion of rectangles, tees, ells,
// inverted tees and outlines given by their corners, solid or hollow, in
// normalweight and lightweight concrete, with an axial tension or an axial
// compression below 0.10 f'c Ag acting too; cover, spacing and least steel; least
// depth.
//
// Not covered, and refused by name: deep beams and loads close to supports,
// greater axial compression, concrete below the least strength of chapter 19,
// steel beyond the tables of chapter 20. Not covered, and named among the checks
// as not judged: development, splices and cut-off of bars, bearing, seismic
// detailing, exposure, fire, slab steel across a flange, ledges. Prestress,
// openings, shotcrete and strut-and-tie design have no place in a brief.
package aci318
