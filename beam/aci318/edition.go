package aci318

import (
	"slices"

	"soffit.example/beam"
	"soffit.example/units"
)

// Code is one edition of ACI 318 as a beam.Code. The zero value is not
// usable; take one from ACI31814, ACI31814M, ACI31819 or ACI31819M.
type Code struct{ e *edition }

var _ beam.Code = Code{}

// ACI31814 is ACI 318-14, in inch-pound units.
func ACI31814() Code { return Code{&us14} }

// ACI31814M is ACI 318M-14, in SI units with its own printed coefficients.
func ACI31814M() Code { return Code{&si14} }

// ACI31819 is ACI 318-19, in inch-pound units.
func ACI31819() Code { return Code{&us19} }

// ACI31819M is ACI 318M-19, in SI units with its own printed coefficients.
func ACI31819M() Code { return Code{&si19} }

// Editions lists the four editions, newest first.
func Editions() []Code { return []Code{ACI31819(), ACI31819M(), ACI31814(), ACI31814M()} }

// edition is one edition in one system of units: coefficients by topic. Each
// topic's type and its printed values stand in the topic's own file.
type edition struct {
	id     string
	title  string
	year   int
	system units.System

	// the units its formulas are printed in
	stress units.StressUnit
	length units.LengthUnit
	area   units.AreaUnit
	force  units.ForceUnit
	moment units.MomentUnit
	steel  units.AreaPerLengthUnit

	materials materialRules  // chapter 19 and 20: materials.go
	loads     loadRules      // 5.3: combinations.go
	reduction reductionRules // 21.2 and 9.3.3.1: reduction.go
	minimum   minimumRules   // 9.6.1: minimumsteel.go
	shear     shearRules     // 22.5: shear.go
	stirrups  stirrupRules   // 9.6.3, 9.7.6.2, 20.2.2.4: stirrups.go
	torsion   torsionRules   // 22.7.4, 22.7.5: torsion.go
	cover     coverRules     // 20.5.1.3 or 20.6.1.3: cover.go
	spacing   spacingRules   // 25.2, 26.4.2.1: spacing.go
	crack     crackRules     // 24.3, 9.7.2.3: crack.go
	depth     depthRules     // 9.3.1: depth.go
	ties      tieRules       // 9.7.6.4: ties.go
	joist     joistRules     // 9.8: joist.go
	scope     scopeRules     // 9.9.1, 22.4 and the like: scope.go
}

var us14 = edition{
	id: "ACI 318-14", title: "Building Code Requirements for Structural Concrete (ACI 318-14)", year: 2014, system: units.US,
	stress: units.PSI, length: units.Inch, area: units.SquareInch, force: units.PoundForce, moment: units.PoundInch, steel: units.SquareInchPerInch,
	materials: materials14US, loads: loadsUS, reduction: reduction14, minimum: minimum14US,
	shear: shear14US, stirrups: stirrups14US, torsion: torsionUS, cover: cover14US, spacing: spacingUS,
	crack: crack14US, depth: depthUS, ties: tiesUS, joist: joistUS, scope: scopeUS,
}

var si14 = edition{
	id: "ACI 318M-14", title: "Building Code Requirements for Structural Concrete (ACI 318M-14)", year: 2014, system: units.SI,
	stress: units.Megapascal, length: units.Millimetre, area: units.SquareMillimetre, force: units.Newton, moment: units.NewtonMillimetre, steel: units.SquareMillimetrePerMillimetre,
	materials: materials14SI, loads: loadsSI, reduction: reduction14, minimum: minimum14SI,
	shear: shear14SI, stirrups: stirrups14SI, torsion: torsionSI, cover: cover14SI, spacing: spacingSI,
	crack: crack14SI, depth: depthSI, ties: tiesSI, joist: joistSI, scope: scopeSI,
}

var us19 = edition{
	id: "ACI 318-19", title: "Building Code Requirements for Structural Concrete (ACI 318-19)", year: 2019, system: units.US,
	stress: units.PSI, length: units.Inch, area: units.SquareInch, force: units.PoundForce, moment: units.PoundInch, steel: units.SquareInchPerInch,
	materials: materials19US, loads: loadsUS, reduction: reduction19, minimum: minimum19US,
	shear: shear19US, stirrups: stirrups19US, torsion: torsionUS, cover: cover19US, spacing: spacingUS,
	crack: crack19US, depth: depthUS, ties: tiesUS, joist: joistUS, scope: scopeUS,
}

var si19 = edition{
	id: "ACI 318M-19", title: "Building Code Requirements for Structural Concrete (ACI 318M-19)", year: 2019, system: units.SI,
	stress: units.Megapascal, length: units.Millimetre, area: units.SquareMillimetre, force: units.Newton, moment: units.NewtonMillimetre, steel: units.SquareMillimetrePerMillimetre,
	materials: materials19SI, loads: loadsSI, reduction: reduction19, minimum: minimum19SI,
	shear: shear19SI, stirrups: stirrups19SI, torsion: torsionSI, cover: cover19SI, spacing: spacingSI,
	crack: crack19SI, depth: depthSI, ties: tiesSI, joist: joistSI, scope: scopeSI,
}

// Edition names the code.
func (c Code) Edition() beam.Edition {
	return beam.Edition{ID: c.e.id, Title: c.e.title, Year: c.e.year, System: c.e.system, Scope: slices.Clone(scopeWords)}
}
