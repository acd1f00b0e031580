package main

// A table is all that package units is made from. The rest of this directory
// only writes it down as Go.
type table struct {
	Bases      []base
	Quantities []quantity
	Products   []product
	Inverses   []inverse
}

// A base is a named exact constant that unit factors are written with.
type base struct {
	Name, Value, Source string
}

// A unit is one unit of a quantity. Its factor to the SI unit is Num/Den; each
// of the two is a constant expression over the bases, and Den may be empty.
type unit struct {
	Name     string // Go name of the constant
	Symbol   string // as the trade writes it, in ASCII
	Num, Den string
	UCUM     string // code of the Unified Code for Units of Measure
	Aliases  []string
}

// A quantity is one opaque type.
type quantity struct {
	Name  string // Go name of the type
	Field string // name of its only field, after its SI unit
	Label string // the words used in messages, without article
	Doc   string // completes "A <name> is ..."
	Dim   [3]int // exponents of kg, m and s
	SI    string // symbol printed under units.SI
	US    string // symbol printed under units.US
	// Examples are texts, one in US and one in SI units, that messages quote.
	Examples [2]string
	Units    []unit // the SI unit first
}

// A product says A x B = C. It makes A.MulB and B.MulA, C.DivA and C.DivB.
// An empty C is a plain number, and makes only the multiplications.
type product struct {
	A, B, C string
	// DivB renames C.DivB where another product has that name; "-" leaves
	// the method out.
	DivB string
}

// An inverse says 1/A = B and 1/B = A.
type inverse struct{ A, B string }

var catalog = table{
	// The inch and the pound are the international yard and pound of 1959
	// (yard = 0.9144 m, pound = 0.45359237 kg); standard gravity is that of
	// the third General Conference on Weights and Measures, 1901. NIST Special
	// Publication 811 (2008), appendix B, lists all three as exact.
	Bases: []base{
		{"inch", "0.0254", "m; a thirty-sixth of the international yard of 1959"},
		{"foot", "12 * inch", "m"},
		{"yard", "3 * foot", "m"},
		{"pound", "0.45359237", "kg; international pound of 1959"},
		{"gravity", "9.80665", "m/s2; standard gravity, CGPM 1901"},
		{"poundForce", "pound * gravity", "N"},
		{"kip", "1000 * poundForce", "N"},
	},
	Quantities: []quantity{
		{
			Name: "Length", Field: "m", Label: "length", Dim: [3]int{0, 1, 0},
			Doc: "a length, a position or a displacement",
			SI:  "mm", US: "in", Examples: [2]string{"14 in", "350 mm"},
			Units: []unit{
				{Name: "Metre", Symbol: "m", Num: "1", UCUM: "m"},
				{Name: "Millimetre", Symbol: "mm", Num: "1e-3", UCUM: "mm"},
				{Name: "Centimetre", Symbol: "cm", Num: "1e-2", UCUM: "cm"},
				{Name: "Inch", Symbol: "in", Num: "inch", UCUM: "[in_i]"},
				{Name: "Foot", Symbol: "ft", Num: "foot", UCUM: "[ft_i]"},
			},
		},
		{
			Name: "Area", Field: "m2", Label: "area", Dim: [3]int{0, 2, 0},
			Doc: "an area, of concrete or of bars",
			SI:  "mm2", US: "in2", Examples: [2]string{"3.16 in2", "2040 mm2"},
			Units: []unit{
				{Name: "SquareMetre", Symbol: "m2", Num: "1", UCUM: "m2"},
				{Name: "SquareMillimetre", Symbol: "mm2", Num: "1e-6", UCUM: "mm2"},
				{Name: "SquareCentimetre", Symbol: "cm2", Num: "1e-4", UCUM: "cm2"},
				{Name: "SquareInch", Symbol: "in2", Num: "inch * inch", UCUM: "[in_i]2"},
				{Name: "SquareFoot", Symbol: "ft2", Num: "foot * foot", UCUM: "[ft_i]2"},
			},
		},
		{
			Name: "SecondMoment", Field: "m4", Label: "second moment of area", Dim: [3]int{0, 4, 0},
			Doc: "a second moment of area",
			SI:  "mm4", US: "in4", Examples: [2]string{"23400 in4", "9.75e9 mm4"},
			Units: []unit{
				{Name: "Metre4", Symbol: "m4", Num: "1", UCUM: "m4"},
				{Name: "Millimetre4", Symbol: "mm4", Num: "1e-12", UCUM: "mm4"},
				{Name: "Centimetre4", Symbol: "cm4", Num: "1e-8", UCUM: "cm4"},
				{Name: "Inch4", Symbol: "in4", Num: "inch * inch * inch * inch", UCUM: "[in_i]4"},
				{Name: "Foot4", Symbol: "ft4", Num: "foot * foot * foot * foot", UCUM: "[ft_i]4"},
			},
		},
		{
			Name: "SectionModulus", Field: "m3Section", Label: "section modulus", Dim: [3]int{0, 3, 0},
			Doc: "a section modulus or a first moment of area",
			SI:  "mm3", US: "in3", Examples: [2]string{"1800 in3", "29.5e6 mm3"},
			Units: []unit{
				{Name: "SectionMetre3", Symbol: "m3", Num: "1", UCUM: "m3"},
				{Name: "SectionMillimetre3", Symbol: "mm3", Num: "1e-9", UCUM: "mm3"},
				{Name: "SectionCentimetre3", Symbol: "cm3", Num: "1e-6", UCUM: "cm3"},
				{Name: "SectionInch3", Symbol: "in3", Num: "inch * inch * inch", UCUM: "[in_i]3"},
			},
		},
		{
			Name: "Volume", Field: "m3", Label: "volume", Dim: [3]int{0, 3, 0},
			Doc: "a volume of material",
			SI:  "m3", US: "ft3", Examples: [2]string{"78 ft3", "2.2 m3"},
			Units: []unit{
				{Name: "CubicMetre", Symbol: "m3", Num: "1", UCUM: "m3"},
				{Name: "CubicFoot", Symbol: "ft3", Num: "foot * foot * foot", UCUM: "[ft_i]3"},
				{Name: "CubicInch", Symbol: "in3", Num: "inch * inch * inch", UCUM: "[in_i]3"},
				{Name: "CubicYard", Symbol: "yd3", Num: "yard * yard * yard", UCUM: "[yd_i]3"},
				{Name: "CubicMillimetre", Symbol: "mm3", Num: "1e-9", UCUM: "mm3"},
				{Name: "Litre", Symbol: "L", Num: "1e-3", UCUM: "L"},
			},
		},
		{
			Name: "Force", Field: "n", Label: "force", Dim: [3]int{1, 1, -2},
			Doc: "a force: a point load, a shear, an axial force or a weight",
			SI:  "kN", US: "kip", Examples: [2]string{"45 kip", "200 kN"},
			Units: []unit{
				{Name: "Newton", Symbol: "N", Num: "1", UCUM: "N"},
				{Name: "Kilonewton", Symbol: "kN", Num: "1e3", UCUM: "kN"},
				{Name: "Meganewton", Symbol: "MN", Num: "1e6", UCUM: "MN"},
				{Name: "PoundForce", Symbol: "lb", Num: "poundForce", UCUM: "[lbf_av]"},
				{Name: "Kip", Symbol: "kip", Num: "kip", UCUM: "10*3.[lbf_av]"},
			},
		},
		{
			Name: "LineLoad", Field: "nPerM", Label: "line load", Dim: [3]int{1, 0, -2},
			Doc: "a force per length, such as a load along a span",
			SI:  "kN/m", US: "kip/ft", Examples: [2]string{"1.4 kip/ft", "20 kN/m"},
			Units: []unit{
				{Name: "NewtonPerMetre", Symbol: "N/m", Num: "1", UCUM: "N/m"},
				{Name: "KilonewtonPerMetre", Symbol: "kN/m", Num: "1e3", UCUM: "kN/m"},
				{Name: "PoundPerFoot", Symbol: "lb/ft", Num: "poundForce", Den: "foot", UCUM: "[lbf_av]/[ft_i]", Aliases: []string{"plf"}},
				{Name: "KipPerFoot", Symbol: "kip/ft", Num: "kip", Den: "foot", UCUM: "10*3.[lbf_av]/[ft_i]", Aliases: []string{"klf"}},
			},
		},
		{
			Name: "AreaLoad", Field: "paLoad", Label: "area load", Dim: [3]int{1, -1, -2},
			Doc: "a load per area of floor or roof",
			SI:  "kPa", US: "psf", Examples: [2]string{"80 psf", "4 kPa"},
			Units: []unit{
				{Name: "NewtonPerSquareMetre", Symbol: "Pa", Num: "1", UCUM: "Pa", Aliases: []string{"N/m2"}},
				{Name: "KilonewtonPerSquareMetre", Symbol: "kPa", Num: "1e3", UCUM: "kPa", Aliases: []string{"kN/m2"}},
				{Name: "PoundPerSquareFoot", Symbol: "psf", Num: "poundForce", Den: "foot * foot", UCUM: "[lbf_av]/[ft_i]2"},
				{Name: "KipPerSquareFoot", Symbol: "ksf", Num: "kip", Den: "foot * foot", UCUM: "10*3.[lbf_av]/[ft_i]2"},
			},
		},
		{
			Name: "Moment", Field: "nm", Label: "moment", Dim: [3]int{1, 2, -2},
			Doc: "a bending moment, a couple or a torque",
			SI:  "kN-m", US: "kip-ft", Examples: [2]string{"250 kip-ft", "340 kN-m"},
			Units: []unit{
				{Name: "NewtonMetre", Symbol: "N-m", Num: "1", UCUM: "N.m"},
				{Name: "KilonewtonMetre", Symbol: "kN-m", Num: "1e3", UCUM: "kN.m"},
				{Name: "NewtonMillimetre", Symbol: "N-mm", Num: "1e-3", UCUM: "N.mm"},
				{Name: "PoundInch", Symbol: "lb-in", Num: "poundForce * inch", UCUM: "[lbf_av].[in_i]"},
				{Name: "PoundFoot", Symbol: "lb-ft", Num: "poundForce * foot", UCUM: "[lbf_av].[ft_i]"},
				{Name: "KipInch", Symbol: "kip-in", Num: "kip * inch", UCUM: "10*3.[lbf_av].[in_i]"},
				{Name: "KipFoot", Symbol: "kip-ft", Num: "kip * foot", UCUM: "10*3.[lbf_av].[ft_i]"},
			},
		},
		{
			Name: "Stress", Field: "pa", Label: "stress", Dim: [3]int{1, -1, -2},
			Doc: "a stress, a strength or a modulus of elasticity",
			SI:  "MPa", US: "ksi", Examples: [2]string{"4.5 ksi", "30 MPa"},
			Units: []unit{
				{Name: "Pascal", Symbol: "Pa", Num: "1", UCUM: "Pa"},
				{Name: "Kilopascal", Symbol: "kPa", Num: "1e3", UCUM: "kPa"},
				{Name: "Megapascal", Symbol: "MPa", Num: "1e6", UCUM: "MPa", Aliases: []string{"N/mm2"}},
				{Name: "Gigapascal", Symbol: "GPa", Num: "1e9", UCUM: "GPa"},
				{Name: "PSI", Symbol: "psi", Num: "poundForce", Den: "inch * inch", UCUM: "[psi]"},
				{Name: "KSI", Symbol: "ksi", Num: "kip", Den: "inch * inch", UCUM: "10*3.[psi]"},
			},
		},
		{
			Name: "Density", Field: "kgPerM3", Label: "density", Dim: [3]int{1, -3, 0},
			Doc: "a mass per volume",
			SI:  "kg/m3", US: "lb/ft3", Examples: [2]string{"150 lb/ft3", "2400 kg/m3"},
			Units: []unit{
				{Name: "KilogramPerCubicMetre", Symbol: "kg/m3", Num: "1", UCUM: "kg/m3"},
				{Name: "PoundPerCubicFoot", Symbol: "lb/ft3", Num: "pound", Den: "foot * foot * foot", UCUM: "[lb_av]/[ft_i]3", Aliases: []string{"pcf"}},
			},
		},
		{
			Name: "UnitWeight", Field: "nPerM3", Label: "unit weight", Dim: [3]int{1, -2, -2},
			Doc: "a weight (a force) per volume",
			SI:  "kN/m3", US: "lb/ft3", Examples: [2]string{"150 lb/ft3", "24 kN/m3"},
			Units: []unit{
				{Name: "NewtonPerCubicMetre", Symbol: "N/m3", Num: "1", UCUM: "N/m3"},
				{Name: "KilonewtonPerCubicMetre", Symbol: "kN/m3", Num: "1e3", UCUM: "kN/m3"},
				{Name: "PoundForcePerCubicFoot", Symbol: "lb/ft3", Num: "poundForce", Den: "foot * foot * foot", UCUM: "[lbf_av]/[ft_i]3", Aliases: []string{"pcf"}},
			},
		},
		{
			Name: "Mass", Field: "kg", Label: "mass", Dim: [3]int{1, 0, 0},
			Doc: "a mass",
			SI:  "kg", US: "lb", Examples: [2]string{"640 lb", "290 kg"},
			Units: []unit{
				{Name: "Kilogram", Symbol: "kg", Num: "1", UCUM: "kg"},
				{Name: "Tonne", Symbol: "t", Num: "1e3", UCUM: "t"},
				{Name: "PoundMass", Symbol: "lb", Num: "pound", UCUM: "[lb_av]"},
				{Name: "ShortTon", Symbol: "ton", Num: "2000 * pound", UCUM: "[ston_av]"},
			},
		},
		{
			Name: "MassPerLength", Field: "kgPerM", Label: "mass per length", Dim: [3]int{1, -1, 0},
			Doc: "a mass per length, such as that of a bar",
			SI:  "kg/m", US: "lb/ft", Examples: [2]string{"2.67 lb/ft", "3.97 kg/m"},
			Units: []unit{
				{Name: "KilogramPerMetre", Symbol: "kg/m", Num: "1", UCUM: "kg/m"},
				{Name: "PoundMassPerFoot", Symbol: "lb/ft", Num: "pound", Den: "foot", UCUM: "[lb_av]/[ft_i]"},
			},
		},
		{
			Name: "AreaPerLength", Field: "m2PerM", Label: "area per length", Dim: [3]int{0, 1, 0},
			Doc: "an area of steel per length of member, such as that of stirrups over their spacing",
			SI:  "mm2/mm", US: "in2/in", Examples: [2]string{"0.02 in2/in", "0.5 mm2/mm"},
			Units: []unit{
				{Name: "SquareMetrePerMetre", Symbol: "m2/m", Num: "1", UCUM: "m2/m"},
				{Name: "SquareMillimetrePerMillimetre", Symbol: "mm2/mm", Num: "1e-3", UCUM: "mm2/mm"},
				{Name: "SquareMillimetrePerMetre", Symbol: "mm2/m", Num: "1e-6", UCUM: "mm2/m"},
				{Name: "SquareInchPerInch", Symbol: "in2/in", Num: "inch", UCUM: "[in_i]2/[in_i]"},
				{Name: "SquareInchPerFoot", Symbol: "in2/ft", Num: "inch * inch", Den: "foot", UCUM: "[in_i]2/[ft_i]"},
			},
		},
		{
			Name: "Curvature", Field: "perM", Label: "curvature", Dim: [3]int{0, -1, 0},
			Doc: "a curvature: a strain or an angle per length",
			SI:  "1/m", US: "1/in", Examples: [2]string{"0.0004 1/in", "0.016 1/m"},
			Units: []unit{
				{Name: "PerMetre", Symbol: "1/m", Num: "1", UCUM: "m-1"},
				{Name: "PerMillimetre", Symbol: "1/mm", Num: "1e3", UCUM: "mm-1"},
				{Name: "PerInch", Symbol: "1/in", Num: "1", Den: "inch", UCUM: "[in_i]-1"},
				{Name: "PerFoot", Symbol: "1/ft", Num: "1", Den: "foot", UCUM: "[ft_i]-1"},
			},
		},
		{
			Name: "Rigidity", Field: "nm2", Label: "flexural rigidity", Dim: [3]int{1, 3, -2},
			Doc: "a flexural rigidity: modulus of elasticity times second moment of area",
			SI:  "kN-m2", US: "kip-in2", Examples: [2]string{"42e6 kip-in2", "120000 kN-m2"},
			Units: []unit{
				{Name: "NewtonSquareMetre", Symbol: "N-m2", Num: "1", UCUM: "N.m2"},
				{Name: "KilonewtonSquareMetre", Symbol: "kN-m2", Num: "1e3", UCUM: "kN.m2"},
				{Name: "KipSquareInch", Symbol: "kip-in2", Num: "kip * inch * inch", UCUM: "10*3.[lbf_av].[in_i]2"},
				{Name: "KipSquareFoot", Symbol: "kip-ft2", Num: "kip * foot * foot", UCUM: "10*3.[lbf_av].[ft_i]2"},
			},
		},
	},
	Products: []product{
		{A: "Length", B: "Length", C: "Area"},
		{A: "Area", B: "Length", C: "Volume"},
		{A: "Area", B: "Area", C: "SecondMoment"},
		{A: "SectionModulus", B: "Length", C: "SecondMoment"},
		{A: "AreaPerLength", B: "Length", C: "Area", DivB: "PerLength"},
		{A: "Curvature", B: "Length"},

		{A: "Force", B: "Length", C: "Moment"},
		{A: "LineLoad", B: "Length", C: "Force"},
		{A: "AreaLoad", B: "Length", C: "LineLoad"},
		{A: "AreaLoad", B: "Area", C: "Force", DivB: "-"},

		{A: "Stress", B: "Area", C: "Force"},
		{A: "Stress", B: "AreaPerLength", C: "LineLoad"},
		{A: "Stress", B: "SectionModulus", C: "Moment"},
		{A: "Stress", B: "SecondMoment", C: "Rigidity"},
		{A: "Rigidity", B: "Curvature", C: "Moment"},

		{A: "UnitWeight", B: "Length", C: "AreaLoad"},
		{A: "UnitWeight", B: "Area", C: "LineLoad"},
		{A: "UnitWeight", B: "Volume", C: "Force"},

		{A: "Density", B: "Volume", C: "Mass"},
		{A: "Density", B: "Area", C: "MassPerLength"},
		{A: "MassPerLength", B: "Length", C: "Mass"},
	},
	Inverses: []inverse{{"Length", "Curvature"}},
}
