package wire

import "soffit.example/units"

// Strengths is the reply about a bare section.
type Strengths struct {
	Engine    Engine        `json:"engine" doc:"What computed the reply."`
	Code      string        `json:"code" doc:"Id of the design code."`
	ReportIn  units.System  `json:"report_in" doc:"Units of the reply."`
	InputHash string        `json:"input_hash" doc:"SHA-256 of the request as read: the same for every way of writing the same request."`
	Verdict   string        `json:"verdict" enum:"satisfied unsatisfied out-of-scope not-applicable" doc:"Of all checks; not-applicable where no demand was given."`
	Section   *SectionReply `json:"section,omitzero" doc:"The section as measured. Absent when out of scope."`
	Flexure   *Flexure      `json:"flexure,omitzero" doc:"Strength in bending. Absent when out of scope."`
	Shear     *Shear        `json:"shear,omitzero" doc:"One-way shear strength. Absent when out of scope."`
	Torsion   *Torsion      `json:"torsion,omitzero" doc:"Strength in torsion. Absent when out of scope."`
	Checks    []Check       `json:"checks" doc:"The demand judged."`
	Refusals  []Refusal     `json:"refusals" doc:"Scope rules that put the section outside the method."`
	Notes     []string      `json:"notes" doc:"What was decided on the way."`
	Cautions  []string      `json:"cautions" doc:"What the reader must bear in mind."`
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

// Torsion is strength in torsion. What closed stirrups decide is absent
// without them, and what a torque decides is absent without one.
type Torsion struct {
	Area           units.Measure `json:"area" doc:"Area enclosed by the outside perimeter of the concrete that counts."`
	Perimeter      units.Measure `json:"perimeter" doc:"That perimeter."`
	FlangeCounted  bool          `json:"flange_counted" doc:"Whether overhanging flanges are part of both."`
	Hollow         bool          `json:"hollow" doc:"Whether the section counts as hollow."`
	Threshold      units.Measure `json:"threshold" doc:"Nominal threshold torsion."`
	Cracking       units.Measure `json:"cracking" doc:"Nominal cracking torsion."`
	Phi            float64       `json:"phi" doc:"Strength reduction factor."`
	MayBeNeglected bool          `json:"may_be_neglected" doc:"Whether the torque asked for stays below the threshold."`

	Torque *units.Measure `json:"torque,omitzero" doc:"Torque designed for: as given, or what is left of a compatibility torque once the rest is shed."`
	Shed   *units.Measure `json:"shed,omitzero" doc:"Part of a compatibility torque that neighbours must take."`

	StirrupArea      *units.Measure `json:"stirrup_area,omitzero" doc:"Area enclosed by the centreline of the closed stirrup."`
	StirrupPerimeter *units.Measure `json:"stirrup_perimeter,omitzero" doc:"Perimeter of that centreline."`
	FlowArea         *units.Measure `json:"flow_area,omitzero" doc:"Area enclosed by the shear flow."`
	Angle            float64        `json:"angle,omitzero" doc:"Angle of the compression diagonals with the axis of the beam, in degrees."`
	Stress           *units.Measure `json:"stress,omitzero" doc:"What shear and torque ask of the concrete section together."`
	StressLimit      *units.Measure `json:"stress_limit,omitzero" doc:"What the concrete section may bear."`

	Transverse          *units.Measure `json:"transverse,omitzero" doc:"Area over spacing of one leg that the torque needs."`
	OuterLeg            *units.Measure `json:"outer_leg,omitzero" doc:"Area over spacing of each outer leg that shear and torque need."`
	OuterLegProvided    *units.Measure `json:"outer_leg_provided,omitzero" doc:"Area over spacing of each outer leg that is there."`
	MinimumPerLength    *units.Measure `json:"minimum_area_per_spacing,omitzero" doc:"Least area of all legs over spacing where torsion needs stirrups."`
	GreatestSpacing     *units.Measure `json:"greatest_spacing,omitzero" doc:"Greatest stirrup spacing along the span."`
	Longitudinal        *units.Measure `json:"longitudinal,omitzero" doc:"Longitudinal steel that the torque needs, round the section; the least amount included."`
	MinimumLongitudinal *units.Measure `json:"minimum_longitudinal,omitzero" doc:"Least longitudinal steel where torsion needs it."`
	Nominal             *units.Measure `json:"nominal,omitzero" doc:"Nominal strength of the steel that shear and bending leave over."`
	Design              *units.Measure `json:"design,omitzero" doc:"Design strength of the same."`

	Notes   []string `json:"notes" doc:"What was decided on the way."`
	Verdict string   `json:"verdict" enum:"pass fail not-applicable not-judged" doc:"Of the checks of torsion."`
}
