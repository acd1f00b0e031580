package beam

import (
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// Brief is what an engineer knows before a beam is designed. Either Spans,
// Supports and Loads describe a member to be analysed, or Demands carry
// factored forces from the caller's own analysis.
//
// The zero value of an optional field asks for the code's own value. What only
// the engineer can confirm is then listed among the result's assumptions; the
// resolved brief is in Result.Problem.
type Brief struct {
	Reference     string // the caller's mark for the beam, echoed in the result
	Section       Section
	Concrete      Concrete
	Reinforcement Reinforcement
	Exposure      Exposure
	Cover         units.Length // clear, to the outermost steel; zero: by the code's table

	Spans        []units.Length // between support centres, left to right
	Supports     []Support      // one more than Spans
	Loads        []Load
	NoSelfWeight bool // true: the caller's dead load already holds the beam's own weight

	Demands []Demand

	Braced         units.Length // greatest spacing of lateral bracing of the compression face; zero: taken as braced
	Serviceability Serviceability
	Preferences    Preferences
	Readings       Readings
}

// Concrete describes the concrete as specified.
type Concrete struct {
	Strength  units.Stress  // specified compressive strength
	Density   units.Density // zero: the code's usual value for the Kind
	Kind      ConcreteKind  // zero: normalweight
	Aggregate units.Length  // nominal maximum size; zero: assumed and listed
	// Splitting is the average splitting tensile strength of lightweight
	// concrete, from tests, with Strength its compressive strength then; zero:
	// not known. Codes that do not go by it say so.
	Splitting units.Stress
	// Normal is the share, by absolute volume, of normalweight aggregate in the
	// fine part of a FineBlend or the coarse part of a CoarseBlend.
	Normal float64
	Fibres bool // steel fibres as the code asks for them to stand in for least stirrups
}

// Reinforcement names where bars come from and how strong they are.
type Reinforcement struct {
	Catalog      string       // an id of package bars
	Yield        units.Stress // longitudinal bars
	StirrupYield units.Stress // zero: as Yield
	Coating      Coating
}

// Support is one support of the beam.
type Support struct {
	Kind  statics.SupportKind
	Width units.Length // along the span; zero: a point support
	Hung  bool         // the reaction pulls on the end region: the beam hangs here, or frames into a girder
}

// Load is one load of one case. Which fields belong to it depends on Shape, as
// each LoadShape says; a field that does not is refused.
type Load struct {
	Case         LoadCase
	Shape        LoadShape
	Span         int // 1-based; 0: every span
	From, To     units.Length
	At           units.Length
	Intensity    units.LineLoad // uniform, or at From
	IntensityEnd units.LineLoad // at To; used when Varies
	Varies       bool           // IntensityEnd is given
	Force        units.Force
	Moment       units.Moment // a couple, clockwise positive; a torque, clockwise positive as seen from the left end
	Hung         bool         // applied at or below the soffit
	Sustained    float64      // share of the load that stays, 0 to 1; for deflection, which is not judged yet
	Path         TorquePath   // of a torque; zero: equilibrium
}

// Demand is one set of factored forces from the caller's own analysis.
type Demand struct {
	Name   string
	Moment units.Moment
	Shear  units.Force
	Torque units.Moment // its sign does not matter
	Path   TorquePath   // of Torque; zero: equilibrium
	Axial  units.Force  // compression positive
}

// Serviceability says what the deflection must protect.
type Serviceability struct {
	Attached Attachment
	Months   int // age at which long-term deflection is wanted, which is not judged yet; zero: 60
}

// Preferences steer the search; none of them relaxes a check.
type Preferences struct {
	Bars      []string       // longitudinal sizes allowed; none: all the code allows in the catalog
	Stirrups  []string       // stirrup sizes allowed; none: the catalog's usual ones
	MaxLayers int            // per face; zero: 2
	MaxLegs   int            // stirrup legs; zero: 4
	MaxZones  int            // stirrup zones in a span, 1 or 3; zero: 3
	Mixed     bool           // allow two neighbouring sizes on one face
	Bundles   int            // most bars in contact; zero or one: none
	Depths    []units.Length // overall depths to try besides Section.Depth
	Prefer    Preference
	SpacingBy units.Length // stirrup spacings are multiples of this; zero: 1/2 in or 10 mm by system
	KeepBest  int          // alternatives kept; zero: 3; negative: none
	NoCures   bool         // do not look for changes that would make a failing brief pass
}

// Readings pick between interpretations where a standard leaves a choice.
// The zero value of each is the default reading.
type Readings struct {
	IgnoreDisplaced bool        // do not deduct the concrete that compression bars displace
	RoundedYield    bool        // use the standard's rounded yield strain where it permits one
	ShearRow        ShearRow    // which of two permitted expressions for concrete shear
	ShearMethod     ShearMethod // simplified or detailed
	TuckedCorner    bool        // corner bars pushed into the stirrup's corner
	CountSideBars   bool        // side bars count in bending, by strain compatibility, where no torque needs them
	TorsionAngle    float64     // of the compression diagonals in the space truss, in degrees; zero: the code's usual one
}

// checkMix reports what is wrong with the aggregate and the tests of a concrete.
func (c *Concrete) checkMix(f *faults) {
	if !(c.Normal >= 0 && c.Normal <= 1) {
		f.add("/concrete/normal_share", "0 to 1", "share of normalweight aggregate is %g", c.Normal)
	}
	if blend := c.Kind == FineBlend || c.Kind == CoarseBlend; !blend && c.Normal != 0 {
		f.add("/concrete/normal_share", "a fine-blend or coarse-blend concrete", "a share of normalweight aggregate is given for %s concrete", c.Kind)
	}
	if c.Splitting.IsZero() {
		return
	}
	f.within("/concrete/splitting", "splitting tensile strength", c.Splitting.Amount(), f.leastStrength.Scale(0.1).Amount(), f.mostStrength.Scale(0.2).Amount())
	if c.Kind == 0 || c.Kind == Normalweight {
		f.add("/concrete/splitting", "a lightweight concrete", "a splitting tensile strength is given for normalweight concrete")
	}
}
