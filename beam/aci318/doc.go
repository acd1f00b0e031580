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
// Not covered, and refused by name: deep beams and loads close to supports,
// significant axial compression, prestress, shotcrete,
// seismic detailing, steel beyond the tables of chapter 20.
package aci318
