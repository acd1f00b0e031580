// Package rederive judges a finished beam again, from the brief and the layout
// alone, by ACI 318-14, 318M-14, 318-19 and 318M-19.
//
// It is a second opinion for tests. It shares no function with the packages
// that design and check: it has its own forces (a force method integrated by
// Gauss's points, read at stations), its own combinations, its own coordinates
// of the bars, its own strength by strain compatibility, its own shear and
// detailing rules, written down again from the provisions as plain numbers in
// inches, pounds and psi, or in millimetres, newtons and megapascals. Of the
// library it uses the plain types of a brief and a layout, the conversion of
// units, and the diameters, areas and bend radii of the catalogs.
//
// Where the provisions leave a choice it takes the reading that finds less
// wrong, so that whatever it does find wrong is wrong under every reading: what
// it reports contradicts a verdict of satisfied. Forces at stations are at
// most the true extremes, for the same reason. Ratios within 1e-6 of a limit
// count as met.
package rederive
