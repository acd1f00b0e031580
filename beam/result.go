package beam

import (
	"github.com/shopspring/decimal"

	"soffit.example/units"
)

// Result is the answer to a brief: plain data from which the reply, the
// calculation sheet and the drawings are made.
type Result struct {
	Engine    Engine
	Code      string
	Reference string
	System    units.System

	Verdict   Verdict
	Governing *Check // as Governing picks it; nil when out of scope

	Reactions []Reaction // factored, of each support; none with demands given directly

	Problem  *Problem // the resolved brief and its forces; nil when out of scope before analysis
	Layout   Layout
	Bars     []BarAt      // every longitudinal bar by coordinates
	Cover    units.Length // clear, to the stirrups
	Section  Section      // as designed: its depth may be one of Preferences.Depths
	Checks   []Check
	Flexure  []FlexureStrength // of the final bars, one per sense that is bent
	Refusals []Refusal

	Assumptions  []Assumption
	Kept         []Combination
	Dropped      []DroppedCombination
	Alternatives []Alternative
	Rejected     []Rejected
	Cures        []Cure // when nothing fits: changes that were tried and found to do
	Binding      []string

	Schedule   []ScheduleLine
	Quantities Quantities
	Cautions   []string
}

// Engine says what computed a result.
type Engine struct{ Name, Version string }

// Version of the engine, given in every result.
const Version = "0.1.0"

// BarAt is one longitudinal bar in the cross-section: X from the left face,
// Y from the bottom face.
type BarAt struct {
	Mark     string
	Bar      string
	Diameter units.Length
	X, Y     units.Length
	Face     Face
	Layer    int
}

// Arrangement is one set of bars or stirrups that the search tried.
type Arrangement struct {
	Face   Face         // zero: stirrups
	Depth  units.Length // overall depth of the section tried
	Layers [MaxLayers]LayerBars
	Beside LayerBars // in the flange beside the web; none where the count is zero
	With   string    // the stirrup size it was laid inside
	// Pressed are bars at the opposite face that were relied on in
	// compression; none where the count is zero.
	Pressed LayerBars
	// Stirrups, for arrangements of stirrups.
	Bar     string
	Legs    int
	Spacing units.Length
	Zones   int
}

// MaxLayers is the most layers of bars that a face may have.
const MaxLayers = 4

// LayerBars is one layer: up to two sizes, the first at the corners.
type LayerBars struct {
	Size  [2]string
	Count [2]int
}

// Rejected is an arrangement with every check it failed.
type Rejected struct {
	Arrangement Arrangement
	Failed      []Check
}

// Alternative is a layout that passes too, and why it was not put first.
type Alternative struct {
	Layout      Layout
	SteelMass   units.Mass
	Depth       units.Length
	WhyNotFirst string
	Governing   string
	Utilization float64
}

// Cure is a change of the brief that was itself designed and found to pass.
type Cure struct {
	Change      string // "depth", "width", "concrete strength", "stirrup legs"
	From, To    units.Amount
	Governing   string // of the beam so changed
	Utilization float64
}

// ScheduleLine is one mark of the bar schedule. Length is zero with demands
// given directly.
type ScheduleLine struct {
	Mark     string
	Bar      string
	Count    int
	Shape    string
	Length   units.Length    // cut length of one
	Mass     decimal.Decimal // of all, in MassUnit
	MassUnit string          // "kg" or "lb"
}

// Quantities of the beam.
type Quantities struct {
	SteelMass        units.Mass
	StirrupMass      units.Mass // part of SteelMass
	Concrete         units.Volume
	Form             units.Area // soffit and both sides
	SteelPerConcrete units.Density
	PerLength        bool // demands given directly: all of it for a unit length, one metre or one foot
}
