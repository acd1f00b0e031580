package beam

import "soffit.example/units"

// SectionQuery asks for the strengths of a bare section.
type SectionQuery struct {
	Section  Section
	Concrete Concrete
	Bending  Sense
	Layers   []SteelLayer
	Stirrups *StirrupSteel // nil: none
	Bent     *BentSteel    // nil: none
	Readings Readings
	Demand   Demand // zero: nothing asked, and no checks
}

// SteelLayer is longitudinal steel at one depth from the top face, whichever
// the sense of bending.
type SteelLayer struct {
	Area  units.Area
	Depth units.Length
	Yield units.Stress
}

// StirrupSteel is transverse steel at a section.
type StirrupSteel struct {
	Area     units.Area // all legs crossed by one shear crack at one stirrup
	Spacing  units.Length
	Yield    units.Stress
	Cover    units.Length // with Diameter, for a drawing: strength does not go by them
	Diameter units.Length
	Across   units.Length // greatest leg-to-leg distance across the web; zero: not known
	Legs     int          // that Area is of; zero: 2
	Angle    float64      // of the legs with the axis of the beam, in degrees; zero: 90
	Open     bool         // not closed: no help in torsion
}

// BentSteel is longitudinal steel bent across the web at a section.
type BentSteel struct {
	Area    units.Area // of one group
	Yield   units.Stress
	Angle   float64      // with the axis of the beam, in degrees
	Spacing units.Length // between groups; zero: a single one
}

// Strengths are a section's strengths under one code.
type Strengths struct {
	Flexure  FlexureStrength
	Shear    ShearStrength
	Torsion  TorsionStrength
	Checks   []Check
	Refusals []Refusal // not empty: the rest is not given
	Notes    []string
}

// FlexureStrength is the strength in bending of one sense, with every value
// on the way.
type FlexureStrength struct {
	Sense          Sense
	NeutralAxis    units.Length // from the extreme compression fibre
	BlockDepth     units.Length
	BlockFactor    float64      // block depth over neutral-axis depth
	EffectiveDepth units.Length // to the centroid of the tension steel
	ExtremeDepth   units.Length // to the extreme tension layer
	ExtremeStrain  float64
	YieldStrain    float64
	Class          string // "tension-controlled", "transition", "compression-controlled"
	Phi            float64
	Nominal        units.Moment
	Design         units.Moment
	MinimumSteel   units.Area
	TensionSteel   units.Area
	LeastStrain    float64
	Layers         []LayerState
	Equilibria     int // more than one: the smallest neutral-axis depth was taken
	CrossCheck     CrossCheck
}

// LayerState is the state of one layer at nominal strength, tension positive.
type LayerState struct {
	Strain float64
	Stress units.Stress
	Force  units.Force
}

// CrossCheck is the same strength found by a second, independent route.
type CrossCheck struct {
	Method     string
	Nominal    units.Moment
	Difference float64 // relative
}

// ShearStrength is one-way shear strength with every value on the way.
type ShearStrength struct {
	Concrete         units.Force
	ConcreteRow      string
	SizeEffect       float64
	SteelRatio       float64
	Steel            units.Force
	Nominal          units.Force
	Phi              float64
	Design           units.Force
	SectionLimit     units.Force         // largest factored shear the section may carry
	MinimumPerLength units.AreaPerLength // zero without stirrups, whose strength it goes by
	MinimumRequired  bool                // at the shear asked for
	GreatestSpacing  units.Length
	GreatestAcross   units.Length // zero: the edition has no such rule
	Notes            []string
}

// TorsionStrength is the strength in torsion, with every value on the way.
// What stirrups decide is zero without them, and what a torque decides is zero
// without one.
type TorsionStrength struct {
	Area          units.Area   // enclosed by the outside perimeter of the concrete
	Perimeter     units.Length // that perimeter
	FlangeCounted bool         // overhanging flanges are part of both
	Hollow        bool
	Threshold     units.Moment // nominal
	Cracking      units.Moment // nominal
	Phi           float64

	Torque         units.Moment // designed for: as given, or what is left once the rest is shed
	Shed           units.Moment // the part of a compatibility torque that neighbours must take
	MayBeNeglected bool

	StirrupArea      units.Area   // enclosed by the centreline of the closed stirrup
	StirrupPerimeter units.Length // of that centreline
	FlowArea         units.Area   // enclosed by the shear flow
	Angle            float64      // of the compression diagonals, in degrees
	Section          units.Stress // what shear and torque ask of the section together
	SectionLimit     units.Stress // and what it may bear

	Transverse          units.AreaPerLength // that the torque needs of one leg
	OuterLeg            units.AreaPerLength // that shear and torque need of each outer leg
	OuterLegProvided    units.AreaPerLength
	MinimumTransverse   units.AreaPerLength // of all legs, where torsion needs stirrups
	GreatestSpacing     units.Length
	Longitudinal        units.Area // that the torque needs, the minimum included
	MinimumLongitudinal units.Area
	Nominal             units.Moment // of the stirrups left over by shear, and of the longitudinal steel left over by bending
	Design              units.Moment
	Notes               []string
}
