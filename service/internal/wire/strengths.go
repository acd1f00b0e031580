package wire

import "soffit.example/units"

// Strengths is the reply about a bare section.
type Strengths struct {
	Engine    Engine       `json:"engine" doc:"What computed the reply."`
	Code      string       `json:"code" doc:"Id of the design code."`
	ReportIn  units.System `json:"report_in" doc:"Units of the reply."`
	InputHash string       `json:"input_hash" doc:"SHA-256 of the request as read: the same for every way of writing the same request."`
	Verdict   string       `json:"verdict" enum:"satisfied unsatisfied out-of-scope not-applicable" doc:"Of all checks; not-applicable where no demand was given."`
	Flexure   *Flexure     `json:"flexure,omitzero" doc:"Strength in bending. Absent when out of scope."`
	Shear     *Shear       `json:"shear,omitzero" doc:"One-way shear strength. Absent when out of scope."`
	Torsion   *Torsion     `json:"torsion,omitzero" doc:"What is known of torsion before stirrups are designed for it. Absent when out of scope."`
	Checks    []Check      `json:"checks" doc:"The demand judged."`
	Refusals  []Refusal    `json:"refusals" doc:"Scope rules that put the section outside the method."`
	Notes     []string     `json:"notes" doc:"What was decided on the way."`
	Cautions  []string     `json:"cautions" doc:"What the reader must bear in mind."`
}

// Flexure is strength in bending of one sense.
type Flexure struct {
	Sense          string        `json:"sense" enum:"positive negative" doc:"Sense of bending; positive has tension at the bottom."`
	NeutralAxis    units.Measure `json:"neutral_axis" doc:"Depth of the neutral axis from the extreme compression fibre."`
	BlockDepth     units.Measure `json:"block_depth" doc:"Depth of the equivalent stress block."`
	Beta1          float64       `json:"beta1" doc:"Block depth over neutral-axis depth."`
	EffectiveDepth units.Measure `json:"effective_depth" doc:"Depth of the centroid of the tension steel."`
	ExtremeDepth   units.Measure `json:"extreme_depth" doc:"Depth of the extreme tension layer."`
	ExtremeStrain  float64       `json:"extreme_strain" doc:"Net tensile strain of that layer."`
	YieldStrain    float64       `json:"yield_strain" doc:"Yield strain of the tension steel."`
	LeastStrain    float64       `json:"least_strain" doc:"Least net tensile strain that the code asks for; 0: it asks for none."`
	Class          string        `json:"class" doc:"Class of the section by that strain."`
	Phi            float64       `json:"phi" doc:"Strength reduction factor."`
	Nominal        units.Measure `json:"nominal" doc:"Nominal strength."`
	Design         units.Measure `json:"design" doc:"Design strength."`
	TensionSteel   units.Measure `json:"tension_steel" doc:"Area of the steel in tension."`
	MinimumSteel   units.Measure `json:"minimum_steel" doc:"Least area of tension steel."`
	Layers         []LayerState  `json:"layers" doc:"State of each layer at nominal strength."`
	Equilibria     int           `json:"equilibria" doc:"Positions of the neutral axis in equilibrium; the smallest depth is taken."`
	CrossCheck     *CrossCheck   `json:"cross_check,omitzero" doc:"The strength found by a second, independent route."`
	Verdict        string        `json:"verdict,omitzero" enum:"pass fail not-applicable not-judged" doc:"Of the checks of bending; of a section alone."`
}

// LayerState is a layer at nominal strength, tension positive.
type LayerState struct {
	Strain float64       `json:"strain" doc:"Strain."`
	Stress units.Measure `json:"stress" doc:"Stress."`
	Force  units.Measure `json:"force" doc:"Force."`
}

// CrossCheck is a second route to a strength.
type CrossCheck struct {
	Method     string        `json:"method" doc:"The second route."`
	Nominal    units.Measure `json:"nominal" doc:"Nominal strength it finds."`
	Difference float64       `json:"difference" doc:"Relative difference of the two."`
}

// Shear is one-way shear strength.
type Shear struct {
	Concrete         units.Measure  `json:"concrete" doc:"Strength of the concrete."`
	ConcreteRow      string         `json:"concrete_row" doc:"Expression that was used for it."`
	SizeEffect       float64        `json:"size_effect" doc:"Size effect factor."`
	SteelRatio       float64        `json:"steel_ratio" doc:"Longitudinal tension steel over web area."`
	Steel            units.Measure  `json:"steel" doc:"Strength of the stirrups."`
	Nominal          units.Measure  `json:"nominal" doc:"Nominal strength."`
	Phi              float64        `json:"phi" doc:"Strength reduction factor."`
	Design           units.Measure  `json:"design" doc:"Design strength."`
	SectionLimit     units.Measure  `json:"section_limit" doc:"Largest factored shear that the section may carry."`
	MinimumPerLength *units.Measure `json:"minimum_area_per_spacing,omitzero" doc:"Least stirrup area over spacing; absent without stirrups, whose strength it goes by."`
	MinimumRequired  bool           `json:"minimum_required" doc:"Whether the shear asked for requires it."`
	GreatestSpacing  units.Measure  `json:"greatest_spacing" doc:"Greatest stirrup spacing along the span."`
	GreatestAcross   *units.Measure `json:"greatest_across,omitzero" doc:"Greatest distance between legs across the web. Absent: the edition has no such rule."`
	Notes            []string       `json:"notes" doc:"What was decided on the way."`
	Verdict          string         `json:"verdict" enum:"pass fail not-applicable not-judged" doc:"Of the checks of shear."`
}

// Torsion is what is known of torsion.
type Torsion struct {
	Area           units.Measure `json:"area" doc:"Area enclosed by the outside perimeter of the concrete."`
	Perimeter      units.Measure `json:"perimeter" doc:"That perimeter."`
	Threshold      units.Measure `json:"threshold" doc:"Nominal threshold torsion."`
	Cracking       units.Measure `json:"cracking" doc:"Nominal cracking torsion."`
	Phi            float64       `json:"phi" doc:"Strength reduction factor."`
	MayBeNeglected bool          `json:"may_be_neglected" doc:"Whether the torque asked for stays below the threshold."`
	Verdict        string        `json:"verdict" enum:"pass fail not-applicable not-judged" doc:"Of the checks of torsion."`
}
