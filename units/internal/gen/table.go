package main

// This file is the one table from which package units is made: the exact
// definitions, the quantities with their units, and the products of
// quantities. Everything else in this directory only writes it down as Go.

// A base is a named exact constant that unit factors are written with.
type base struct {
	name, value, source string
}

// The inch and the pound are the international yard and pound of 1959
// (yard = 0.9144 m, pound = 0.45359237 kg); standard gravity is that of the
// third General Conference on Weights and Measures, 1901. All three are listed
// as exact in NIST Special Publication 811 (2008), appendix B.
var bases = []base{
	{"inch", "0.0254", "m; international yard of 1959, a thirty-sixth"},
	{"foot", "12 * inch", "m"},
	{"yard", "3 * foot", "m"},
	{"pound", "0.45359237", "kg; international pound of 1959"},
	{"gravity", "9.80665", "m/s2; standard gravity, CGPM 1901"},
	{"poundForce", "pound * gravity", "N"},
	{"kip", "1000 * poundForce", "N"},
}

// A unit is one unit of a quantity. Its factor to the SI unit is num/den; each
// of the two is a constant expression over the bases, and den may be empty.
// The first unit of a quantity is its SI unit.
type unit struct {
	name     string // Go name of the constant
	symbol   string // as the trade writes it, in ASCII
	num, den string
	ucum     string // code of the Unified Code for Units of Measure
	aliases  []string
}

// A quantity is one opaque type.
type quantity struct {
	name  string // Go name of the type
	field string // name of its only field, after its SI unit
	label string // the words used in error messages, without article
	doc   string // completes "A <name> is ..."
	dim   [3]int // exponents of kg, m and s
	si    string // symbol printed under units.SI
	us    string // symbol printed under units.US
	// examples are texts, one of each system, that messages quote.
	examples [2]string
	units    []unit
}

var quantities = []quantity{
	{
		name: "Length", field: "m", label: "length", dim: [3]int{0, 1, 0},
		doc: "a length, a position or a displacement",
		si:  "mm", us: "in", examples: [2]string{"14 in", "350 mm"},
		units: []unit{
			{name: "Metre", symbol: "m", num: "1", ucum: "m"},
			{name: "Millimetre", symbol: "mm", num: "1e-3", ucum: "mm"},
			{name: "Centimetre", symbol: "cm", num: "1e-2", ucum: "cm"},
			{name: "Inch", symbol: "in", num: "inch", ucum: "[in_i]"},
			{name: "Foot", symbol: "ft", num: "foot", ucum: "[ft_i]"},
		},
	},
	{
		name: "Area", field: "m2", label: "area", dim: [3]int{0, 2, 0},
		doc: "an area, of concrete or of bars",
		si:  "mm2", us: "in2", examples: [2]string{"3.16 in2", "2040 mm2"},
		units: []unit{
			{name: "SquareMetre", symbol: "m2", num: "1", ucum: "m2"},
			{name: "SquareMillimetre", symbol: "mm2", num: "1e-6", ucum: "mm2"},
			{name: "SquareCentimetre", symbol: "cm2", num: "1e-4", ucum: "cm2"},
			{name: "SquareInch", symbol: "in2", num: "inch * inch", ucum: "[in_i]2"},
			{name: "SquareFoot", symbol: "ft2", num: "foot * foot", ucum: "[ft_i]2"},
		},
	},
	{
		name: "SecondMoment", field: "m4", label: "second moment of area", dim: [3]int{0, 4, 0},
		doc: "a second moment of area",
		si:  "mm4", us: "in4", examples: [2]string{"23400 in4", "9.75e9 mm4"},
		units: []unit{
			{name: "Metre4", symbol: "m4", num: "1", ucum: "m4"},
			{name: "Millimetre4", symbol: "mm4", num: "1e-12", ucum: "mm4"},
			{name: "Centimetre4", symbol: "cm4", num: "1e-8", ucum: "cm4"},
			{name: "Inch4", symbol: "in4", num: "inch * inch * inch * inch", ucum: "[in_i]4"},
			{name: "Foot4", symbol: "ft4", num: "foot * foot * foot * foot", ucum: "[ft_i]4"},
		},
	},
	{
		name: "SectionModulus", field: "m3Section", label: "section modulus", dim: [3]int{0, 3, 0},
		doc: "a section modulus or a first moment of area",
		si:  "mm3", us: "in3", examples: [2]string{"1800 in3", "29.5e6 mm3"},
		units: []unit{
			{name: "SectionMetre3", symbol: "m3", num: "1", ucum: "m3"},
			{name: "SectionMillimetre3", symbol: "mm3", num: "1e-9", ucum: "mm3"},
			{name: "SectionCentimetre3", symbol: "cm3", num: "1e-6", ucum: "cm3"},
			{name: "SectionInch3", symbol: "in3", num: "inch * inch * inch", ucum: "[in_i]3"},
		},
	},
	{
		name: "Volume", field: "m3", label: "volume", dim: [3]int{0, 3, 0},
		doc: "a volume of material",
		si:  "m3", us: "ft3", examples: [2]string{"78 ft3", "2.2 m3"},
		units: []unit{
			{name: "CubicMetre", symbol: "m3", num: "1", ucum: "m3"},
			{name: "CubicFoot", symbol: "ft3", num: "foot * foot * foot", ucum: "[ft_i]3"},
			{name: "CubicInch", symbol: "in3", num: "inch * inch * inch", ucum: "[in_i]3"},
			{name: "CubicYard", symbol: "yd3", num: "yard * yard * yard", ucum: "[yd_i]3"},
			{name: "CubicMillimetre", symbol: "mm3", num: "1e-9", ucum: "mm3"},
			{name: "Litre", symbol: "L", num: "1e-3", ucum: "L"},
		},
	},
	{
		name: "Force", field: "n", label: "force", dim: [3]int{1, 1, -2},
		doc: "a force: a point load, a shear, an axial force or a weight",
		si:  "kN", us: "kip", examples: [2]string{"45 kip", "200 kN"},
		units: []unit{
			{name: "Newton", symbol: "N", num: "1", ucum: "N"},
			{name: "Kilonewton", symbol: "kN", num: "1e3", ucum: "kN"},
			{name: "Meganewton", symbol: "MN", num: "1e6", ucum: "MN"},
			{name: "PoundForce", symbol: "lb", num: "poundForce", ucum: "[lbf_av]"},
			{name: "Kip", symbol: "kip", num: "kip", ucum: "10*3.[lbf_av]"},
		},
	},
	{
		name: "LineLoad", field: "nPerM", label: "line load", dim: [3]int{1, 0, -2},
		doc: "a force per length, such as a load along a span",
		si:  "kN/m", us: "kip/ft", examples: [2]string{"1.4 kip/ft", "20 kN/m"},
		units: []unit{
			{name: "NewtonPerMetre", symbol: "N/m", num: "1", ucum: "N/m"},
			{name: "KilonewtonPerMetre", symbol: "kN/m", num: "1e3", ucum: "kN/m"},
			{name: "PoundPerFoot", symbol: "lb/ft", num: "poundForce", den: "foot", ucum: "[lbf_av]/[ft_i]", aliases: []string{"plf"}},
			{name: "KipPerFoot", symbol: "kip/ft", num: "kip", den: "foot", ucum: "10*3.[lbf_av]/[ft_i]", aliases: []string{"klf"}},
		},
	},
	{
		name: "AreaLoad", field: "paLoad", label: "area load", dim: [3]int{1, -1, -2},
		doc: "a load per area of floor or roof",
		si:  "kPa", us: "psf", examples: [2]string{"80 psf", "4 kPa"},
		units: []unit{
			{name: "NewtonPerSquareMetre", symbol: "Pa", num: "1", ucum: "Pa", aliases: []string{"N/m2"}},
			{name: "KilonewtonPerSquareMetre", symbol: "kPa", num: "1e3", ucum: "kPa", aliases: []string{"kN/m2"}},
			{name: "PoundPerSquareFoot", symbol: "psf", num: "poundForce", den: "foot * foot", ucum: "[lbf_av]/[ft_i]2"},
			{name: "KipPerSquareFoot", symbol: "ksf", num: "kip", den: "foot * foot", ucum: "10*3.[lbf_av]/[ft_i]2"},
		},
	},
	{
		name: "Moment", field: "nm", label: "moment", dim: [3]int{1, 2, -2},
		doc: "a bending moment, a couple or a torque",
		si:  "kN-m", us: "kip-ft", examples: [2]string{"250 kip-ft", "340 kN-m"},
		units: []unit{
			{name: "NewtonMetre", symbol: "N-m", num: "1", ucum: "N.m"},
			{name: "KilonewtonMetre", symbol: "kN-m", num: "1e3", ucum: "kN.m"},
			{name: "NewtonMillimetre", symbol: "N-mm", num: "1e-3", ucum: "N.mm"},
			{name: "PoundInch", symbol: "lb-in", num: "poundForce * inch", ucum: "[lbf_av].[in_i]"},
			{name: "PoundFoot", symbol: "lb-ft", num: "poundForce * foot", ucum: "[lbf_av].[ft_i]"},
			{name: "KipInch", symbol: "kip-in", num: "kip * inch", ucum: "10*3.[lbf_av].[in_i]"},
			{name: "KipFoot", symbol: "kip-ft", num: "kip * foot", ucum: "10*3.[lbf_av].[ft_i]"},
		},
	},
	{
		name: "Stress", field: "pa", label: "stress", dim: [3]int{1, -1, -2},
		doc: "a stress, a strength or a modulus of elasticity",
		si:  "MPa", us: "ksi", examples: [2]string{"4.5 ksi", "30 MPa"},
		units: []unit{
			{name: "Pascal", symbol: "Pa", num: "1", ucum: "Pa"},
			{name: "Kilopascal", symbol: "kPa", num: "1e3", ucum: "kPa"},
			{name: "Megapascal", symbol: "MPa", num: "1e6", ucum: "MPa", aliases: []string{"N/mm2"}},
			{name: "Gigapascal", symbol: "GPa", num: "1e9", ucum: "GPa"},
			{name: "PSI", symbol: "psi", num: "poundForce", den: "inch * inch", ucum: "[psi]"},
			{name: "KSI", symbol: "ksi", num: "kip", den: "inch * inch", ucum: "10*3.[psi]"},
		},
	},
	{
		name: "Density", field: "kgPerM3", label: "density", dim: [3]int{1, -3, 0},
		doc: "a mass per volume",
		si:  "kg/m3", us: "lb/ft3", examples: [2]string{"150 lb/ft3", "2400 kg/m3"},
		units: []unit{
			{name: "KilogramPerCubicMetre", symbol: "kg/m3", num: "1", ucum: "kg/m3"},
			{name: "PoundPerCubicFoot", symbol: "lb/ft3", num: "pound", den: "foot * foot * foot", ucum: "[lb_av]/[ft_i]3", aliases: []string{"pcf"}},
		},
	},
	{
		name: "UnitWeight", field: "nPerM3", label: "unit weight", dim: [3]int{1, -2, -2},
		doc: "a weight (a force) per volume",
		si:  "kN/m3", us: "lb/ft3", examples: [2]string{"150 lb/ft3", "24 kN/m3"},
		units: []unit{
			{name: "NewtonPerCubicMetre", symbol: "N/m3", num: "1", ucum: "N/m3"},
			{name: "KilonewtonPerCubicMetre", symbol: "kN/m3", num: "1e3", ucum: "kN/m3"},
			{name: "PoundForcePerCubicFoot", symbol: "lb/ft3", num: "poundForce", den: "foot * foot * foot", ucum: "[lbf_av]/[ft_i]3", aliases: []string{"pcf"}},
		},
	},
	{
		name: "Mass", field: "kg", label: "mass", dim: [3]int{1, 0, 0},
		doc: "a mass",
		si:  "kg", us: "lb", examples: [2]string{"640 lb", "290 kg"},
		units: []unit{
			{name: "Kilogram", symbol: "kg", num: "1", ucum: "kg"},
			{name: "Tonne", symbol: "t", num: "1e3", ucum: "t"},
			{name: "PoundMass", symbol: "lb", num: "pound", ucum: "[lb_av]"},
			{name: "ShortTon", symbol: "ton", num: "2000 * pound", ucum: "[ston_av]"},
		},
	},
	{
		name: "MassPerLength", field: "kgPerM", label: "mass per length", dim: [3]int{1, -1, 0},
		doc: "a mass per length, such as that of a bar",
		si:  "kg/m", us: "lb/ft", examples: [2]string{"2.67 lb/ft", "3.97 kg/m"},
		units: []unit{
			{name: "KilogramPerMetre", symbol: "kg/m", num: "1", ucum: "kg/m"},
			{name: "PoundMassPerFoot", symbol: "lb/ft", num: "pound", den: "foot", ucum: "[lb_av]/[ft_i]"},
		},
	},
	{
		name: "AreaPerLength", field: "m2PerM", label: "area per length", dim: [3]int{0, 1, 0},
		doc: "an area of steel per length of member, such as that of stirrups over their spacing",
		si:  "mm2/mm", us: "in2/in", examples: [2]string{"0.02 in2/in", "0.5 mm2/mm"},
		units: []unit{
			{name: "SquareMetrePerMetre", symbol: "m2/m", num: "1", ucum: "m2/m"},
			{name: "SquareMillimetrePerMillimetre", symbol: "mm2/mm", num: "1e-3", ucum: "mm2/mm"},
			{name: "SquareMillimetrePerMetre", symbol: "mm2/m", num: "1e-6", ucum: "mm2/m"},
			{name: "SquareInchPerInch", symbol: "in2/in", num: "inch", ucum: "[in_i]2/[in_i]"},
			{name: "SquareInchPerFoot", symbol: "in2/ft", num: "inch * inch", den: "foot", ucum: "[in_i]2/[ft_i]"},
		},
	},
	{
		name: "Curvature", field: "perM", label: "curvature", dim: [3]int{0, -1, 0},
		doc: "a curvature: a strain or an angle per length",
		si:  "1/m", us: "1/in", examples: [2]string{"0.0004 1/in", "0.016 1/m"},
		units: []unit{
			{name: "PerMetre", symbol: "1/m", num: "1", ucum: "m-1"},
			{name: "PerMillimetre", symbol: "1/mm", num: "1e3", ucum: "mm-1"},
			{name: "PerInch", symbol: "1/in", num: "1", den: "inch", ucum: "[in_i]-1"},
			{name: "PerFoot", symbol: "1/ft", num: "1", den: "foot", ucum: "[ft_i]-1"},
		},
	},
	{
		name: "Rigidity", field: "nm2", label: "flexural rigidity", dim: [3]int{1, 3, -2},
		doc: "a flexural rigidity: modulus of elasticity times second moment of area",
		si:  "kN-m2", us: "kip-in2", examples: [2]string{"42e6 kip-in2", "120000 kN-m2"},
		units: []unit{
			{name: "NewtonSquareMetre", symbol: "N-m2", num: "1", ucum: "N.m2"},
			{name: "KilonewtonSquareMetre", symbol: "kN-m2", num: "1e3", ucum: "kN.m2"},
			{name: "KipSquareInch", symbol: "kip-in2", num: "kip * inch * inch", ucum: "10*3.[lbf_av].[in_i]2"},
			{name: "KipSquareFoot", symbol: "kip-ft2", num: "kip * foot * foot", ucum: "10*3.[lbf_av].[ft_i]2"},
		},
	},
}

// A product says a x b = c. It makes a.MulB and b.MulA, c.DivA and c.DivB.
// An empty c is a plain number, and makes only the multiplications.
type product struct {
	a, b, c string
	// divB renames c.DivB where another product has that name; "-" leaves
	// the method out.
	divB string
}

var products = []product{
	{a: "Length", b: "Length", c: "Area"},
	{a: "Area", b: "Length", c: "Volume"},
	{a: "Area", b: "Area", c: "SecondMoment"},
	{a: "SectionModulus", b: "Length", c: "SecondMoment"},
	{a: "AreaPerLength", b: "Length", c: "Area", divB: "PerLength"},
	{a: "Curvature", b: "Length"},

	{a: "Force", b: "Length", c: "Moment"},
	{a: "LineLoad", b: "Length", c: "Force"},
	{a: "AreaLoad", b: "Length", c: "LineLoad"},
	{a: "AreaLoad", b: "Area", c: "Force", divB: "-"},

	{a: "Stress", b: "Area", c: "Force"},
	{a: "Stress", b: "AreaPerLength", c: "LineLoad"},
	{a: "Stress", b: "SectionModulus", c: "Moment"},
	{a: "Stress", b: "SecondMoment", c: "Rigidity"},
	{a: "Rigidity", b: "Curvature", c: "Moment"},

	{a: "UnitWeight", b: "Length", c: "AreaLoad"},
	{a: "UnitWeight", b: "Area", c: "LineLoad"},
	{a: "UnitWeight", b: "Volume", c: "Force"},

	{a: "Density", b: "Volume", c: "Mass"},
	{a: "Density", b: "Area", c: "MassPerLength"},
	{a: "MassPerLength", b: "Length", c: "Mass"},
}

// An inverse says 1/a = b and 1/b = a.
var inverses = [][2]string{{"Length", "Curvature"}}
