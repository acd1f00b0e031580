package wire

import "soffit.example/units"

// Design is the reply to a brief, and to a layout that was checked.
type Design struct {
	Engine    Engine        `json:"engine" doc:"What computed the reply."`
	Code      string        `json:"code" doc:"Id of the design code."`
	Reference string        `json:"reference,omitzero" doc:"The reference of the brief."`
	ReportIn  units.System  `json:"report_in" doc:"Units of the reply."`
	InputHash string        `json:"input_hash" doc:"SHA-256 of the request as read: the same for every way of writing the same request."`
	Verdict   string        `json:"verdict" enum:"satisfied unsatisfied out-of-scope" doc:"satisfied: every judged limit state is met. unsatisfied: the input is sound, the beam is not. out-of-scope: a scope rule says that the method does not apply."`
	Governing *Governing    `json:"governing,omitzero" doc:"The judged check with the largest utilization."`
	Section   *SectionReply `json:"section,omitzero" doc:"The section as designed."`
	Layout    LayoutReply   `json:"layout" doc:"The bars and stirrups."`
	Bars      []BarAt       `json:"bars" doc:"Every longitudinal bar by coordinates."`
	Checks    []Check       `json:"checks" doc:"Every limit state, judged or not."`
	NotJudged []string      `json:"not_judged" doc:"Ids of the checks that belong to the job and were not judged: the verdict does not speak of them."`
	Flexure   []Flexure     `json:"flexure" doc:"Strength in bending of the layout, one for each sense that is bent."`
	Reactions []Reaction    `json:"reactions" doc:"Factored reactions of the supports that hold; none with demands given directly."`
	Refusals  []Refusal     `json:"refusals" doc:"Scope rules that put the problem outside the method."`

	Assumptions  []Assumption  `json:"assumptions" doc:"What was taken for granted on the way, and what the finished design found."`
	Combinations Combinations  `json:"combinations" doc:"Load combinations used and dropped."`
	Alternatives []Alternative `json:"alternatives" doc:"Layouts that pass too."`
	Rejected     []Rejected    `json:"rejected" doc:"Arrangements that were tried, with every check they failed: the first 500."`
	RejectedMore int           `json:"rejected_more,omitzero" doc:"Arrangements that were rejected besides and are left out here. Absent: none."`
	Binding      []string      `json:"binding" doc:"Where nothing fits: the limits that stand in the way."`
	Cures        []Cure        `json:"cures" doc:"Where nothing fits: changes of the brief that were tried and found to do."`

	Schedule   []ScheduleLine `json:"schedule" doc:"Bar schedule."`
	Quantities *Quantities    `json:"quantities,omitzero" doc:"Quantities of the beam."`
	Cautions   []string       `json:"cautions" doc:"What the reader must bear in mind."`
}

// Reaction is what the combinations ask of one support.
type Reaction struct {
	Support           int            `json:"support" doc:"Its place from the left, counted from 1."`
	Most              units.Measure  `json:"most" doc:"Greatest force, positive upward."`
	Least             units.Measure  `json:"least" doc:"Least force; negative is uplift."`
	CombinationMost   string         `json:"combination_most" doc:"Combination of the greatest force."`
	CombinationLeast  string         `json:"combination_least" doc:"Combination of the least force."`
	Moment            *units.Measure `json:"moment,omitzero" doc:"Of a fixed end: the greatest moment that it must hold."`
	Torque            *units.Measure `json:"torque,omitzero" doc:"The greatest torque that the support must hold against twist, whichever way it turns. Absent: none."`
	CombinationTorque string         `json:"combination_torque,omitzero" doc:"Combination of that torque."`
}

// Engine says what computed a reply.
type Engine struct {
	Name    string `json:"name" doc:"Name of the engine."`
	Version string `json:"version" doc:"Version of the engine."`
}

// Governing names the check that governs.
type Governing struct {
	Check       string  `json:"check" doc:"Id of the check."`
	Utilization float64 `json:"utilization" doc:"Demand over capacity; 1e9 stands for no capacity at all."`
}

// SectionReply is a section in a reply, with its flange as resolved.
type SectionReply struct {
	Shape           string         `json:"shape" doc:"Shape of the outline."`
	Width           *units.Measure `json:"width,omitzero" doc:"Width of a rectangle."`
	WebWidth        *units.Measure `json:"web_width,omitzero" doc:"Width of the web of a flanged section; of a polygon, of the upright strip in which the stirrups stand."`
	Depth           units.Measure  `json:"depth" doc:"Overall depth."`
	FlangeThickness *units.Measure `json:"flange_thickness,omitzero" doc:"Thickness of the flange or of the ledges."`
	FlangeWidth     *units.Measure `json:"flange_width,omitzero" doc:"Width of the flange that works with the web: as given, or as the code finds it from the slab."`
	OverhangLeft    *units.Measure `json:"overhang_left,omitzero" doc:"Flange on the left of the web. Absent: none."`
	OverhangRight   *units.Measure `json:"overhang_right,omitzero" doc:"Flange on the right of the web. Absent: none."`
	Measured        *Measured      `json:"measured,omitzero" doc:"What the section measures. Absent where its flange is not resolved."`
}

// Measured is what a section measures.
type Measured struct {
	Gross       units.Measure `json:"gross" doc:"Area of the concrete, net of hollows."`
	Enclosed    units.Measure `json:"enclosed" doc:"Area inside the outside perimeter, hollows included."`
	Perimeter   units.Measure `json:"perimeter" doc:"Outside perimeter."`
	Least       units.Measure `json:"least_width" doc:"Least width of concrete at any level within the strip in which the stirrups stand: the web of shear."`
	Overall     units.Measure `json:"overall_width" doc:"Width between the ends."`
	TopWidth    units.Measure `json:"top_width" doc:"Width of the top face."`
	BottomWidth units.Measure `json:"bottom_width" doc:"Width of the bottom face."`
	Walls       *Walls        `json:"walls,omitzero" doc:"Of a hollow section: its least walls."`
}

// Walls are the least thicknesses of concrete between the hollows of a section
// and the outside of the strip in which the stirrups stand.
type Walls struct {
	Side   units.Measure `json:"side" doc:"At the sides."`
	Top    units.Measure `json:"top" doc:"At the top."`
	Bottom units.Measure `json:"bottom" doc:"At the bottom."`
}

// LayoutReply is a layout in a reply; it can be sent to /v1/checks as it is.
type LayoutReply struct {
	Longitudinal []RowReply  `json:"longitudinal" doc:"Groups of like bars."`
	Transverse   []ZoneReply `json:"transverse" doc:"Runs of like stirrups."`
	Bent         []BentReply `json:"bent" doc:"Bars bent across the web to carry shear."`
}

// RowReply is a [Row] in a reply.
type RowReply struct {
	Mark          string         `json:"mark,omitzero" doc:"Mark of the bars."`
	Bar           string         `json:"bar" doc:"Size, as the catalog names it."`
	Count         int            `json:"count" doc:"Number of bars; of side bars, on each side face."`
	Face          string         `json:"face" enum:"bottom top side" doc:"Face at which the bars lie."`
	Layer         int            `json:"layer,omitzero" doc:"Layer of the face, 1 nearest to it. Side bars have none."`
	Flange        bool           `json:"flange,omitzero" doc:"true: the bars lie in the flange beside the web."`
	Spacing       *units.Measure `json:"spacing,omitzero" doc:"Vertical spacing of side bars, or spacing across of bars in a flange."`
	Bundled       int            `json:"bundled,omitzero" doc:"Bars in contact in each bundle. Absent: single bars."`
	Yield         *units.Measure `json:"yield,omitzero" doc:"Yield strength of these bars. Absent: that of the brief."`
	InCompression bool           `json:"in_compression,omitzero" doc:"true: the bars are relied on as compression steel."`
	From          *units.Measure `json:"from,omitzero" doc:"Start along the beam. Absent with demands given directly."`
	To            *units.Measure `json:"to,omitzero" doc:"End along the beam. Absent with demands given directly."`
	Start         string         `json:"start,omitzero" doc:"How the left end stops."`
	End           string         `json:"end,omitzero" doc:"How the right end stops."`
}

// ZoneReply is a [Zone] in a reply.
type ZoneReply struct {
	Mark    string         `json:"mark,omitzero" doc:"Mark of the stirrups."`
	Span    int            `json:"span,omitzero" doc:"Number of the span. Absent with demands given directly."`
	Bar     string         `json:"bar" doc:"Size, as the catalog names it."`
	Legs    int            `json:"legs" doc:"Vertical legs."`
	Spacing units.Measure  `json:"spacing" doc:"Spacing along the span."`
	Count   int            `json:"count,omitzero" doc:"Number of stirrups. Absent with demands given directly."`
	From    *units.Measure `json:"from,omitzero" doc:"Start of the zone, from the span's left end. Absent with demands given directly."`
	To      *units.Measure `json:"to,omitzero" doc:"End of the zone, from the span's left end. Absent with demands given directly."`
	Form    string         `json:"form,omitzero" doc:"Whether the stirrup is closed."`
	Angle   float64        `json:"angle,omitzero" doc:"Angle of the legs with the axis of the beam, in degrees. Absent: 90."`
}

// BentReply is a [Bent] in a reply.
type BentReply struct {
	Mark    string         `json:"mark,omitzero" doc:"Mark of the bars."`
	Bar     string         `json:"bar" doc:"Size, as the catalog names it."`
	Count   int            `json:"count" doc:"Bars bent at one place."`
	Span    int            `json:"span,omitzero" doc:"Number of the span."`
	At      units.Measure  `json:"at" doc:"Where the first slope crosses mid-depth, from the span's left end."`
	Angle   float64        `json:"angle" doc:"Angle of the slope with the axis of the beam, in degrees."`
	Rises   string         `json:"rises" enum:"left right" doc:"End of the span towards which the bars rise."`
	Bends   int            `json:"bends,omitzero" doc:"Places, one spacing apart, at which as many bars are bent."`
	Spacing *units.Measure `json:"spacing,omitzero" doc:"Distance between those places. Absent with one."`
}

// BarAt is a bar by coordinates: x from the left end of the whole section, y
// from its bottom.
type BarAt struct {
	Mark     string        `json:"mark" doc:"Mark of the bar."`
	Bar      string        `json:"bar" doc:"Size, as the catalog names it."`
	Diameter units.Measure `json:"diameter" doc:"Nominal diameter."`
	X        units.Measure `json:"x" doc:"From the left end of the whole section to the centre."`
	Y        units.Measure `json:"y" doc:"From the bottom face to the centre."`
	Face     string        `json:"face" enum:"bottom top side" doc:"Face at which the bar lies."`
	Layer    int           `json:"layer,omitzero" doc:"Layer of the face. Side bars have none."`
}

// Check is one limit state.
type Check struct {
	ID          string         `json:"id" doc:"Stable, dotted, the most general word first."`
	Clause      string         `json:"clause" doc:"Clause of the design code."`
	Span        int            `json:"span,omitzero" doc:"Number of the span. Absent: the whole beam, or a demand given directly."`
	At          *units.Measure `json:"at,omitzero" doc:"Position from the span's left end."`
	Face        string         `json:"face,omitzero" enum:"bottom top side" doc:"Face of the beam that the check is about."`
	Combination string         `json:"combination,omitzero" doc:"Load combination, or name of the demand."`
	Demand      *units.Measure `json:"demand,omitzero" doc:"What is asked. Of a least amount, the amount required."`
	Capacity    *units.Measure `json:"capacity,omitzero" doc:"What is there. Of a least amount, the amount provided."`
	Utilization *float64       `json:"utilization,omitzero" doc:"Demand over capacity. A limit met exactly passes."`
	Verdict     string         `json:"verdict" enum:"pass fail not-applicable not-judged" doc:"not-judged: within the code, not within this version or this input; never counted as passed."`
	Reason      string         `json:"reason,omitzero" doc:"Why not applicable or not judged, or what was decided on the way."`
	Working     []Step         `json:"working,omitzero" doc:"The working, in order, where full detail was asked for. Strengths have none: their values are members of the reply."`
}

// Step is one line of the working.
type Step struct {
	Symbol       string        `json:"symbol" doc:"Symbol of the value."`
	Meaning      string        `json:"meaning" doc:"What it is."`
	Clause       string        `json:"clause,omitzero" doc:"Clause it follows."`
	Expression   string        `json:"expression,omitzero" doc:"Expression in the symbols of earlier steps. Absent of an input."`
	Substitution string        `json:"substitution,omitzero" doc:"The expression with the values of those steps."`
	Value        units.Measure `json:"value" doc:"The value, in the unit its clause is written in."`
	Note         string        `json:"note,omitzero" doc:"The branch taken, or the cap that acted."`
}

// Refusal is a scope rule that was met.
type Refusal struct {
	Rule   string `json:"rule" doc:"Stable, dotted."`
	Clause string `json:"clause" doc:"Clause of the design code."`
	Detail string `json:"detail" doc:"The values that met the rule, and the method that would apply."`
}

// Assumption is something taken for granted.
type Assumption struct {
	ID       string   `json:"id" doc:"Stable, dotted."`
	Assumed  string   `json:"assumed" doc:"What was assumed, with its value."`
	UsedIn   []string `json:"used_in" doc:"Ids of the checks that rest on it."`
	Found    string   `json:"found,omitzero" doc:"What the finished design shows."`
	Status   string   `json:"status" enum:"confirmed refuted to-confirm" doc:"confirmed, refuted by the finished design, or the engineer's to confirm."`
	Holds    bool     `json:"holds" doc:"Whether the finished design bears it out."`
	Open     bool     `json:"open,omitzero" doc:"true: nothing in the input can confirm it; it stays the engineer's to confirm."`
	Decisive bool     `json:"decisive,omitzero" doc:"true: the verdict cannot stand if it does not hold."`
}

// Combinations are the load combinations of a design.
type Combinations struct {
	Kept    []Combination        `json:"kept" doc:"Those analysed."`
	Dropped []DroppedCombination `json:"dropped" doc:"Those not used, and why."`
}

// Combination is a load combination.
type Combination struct {
	ID      string   `json:"id" doc:"The combination in the code's words."`
	Clause  string   `json:"clause" doc:"Clause of the design code."`
	Factors []Factor `json:"factors" doc:"Load factors by case."`
}

// Factor multiplies the loads of one case.
type Factor struct {
	Case   string  `json:"case" doc:"Load case."`
	Factor float64 `json:"factor" doc:"Load factor."`
}

// DroppedCombination is a combination that was not used.
type DroppedCombination struct {
	ID     string `json:"id" doc:"The combination in the code's words."`
	Clause string `json:"clause" doc:"Clause of the design code."`
	Reason string `json:"reason" doc:"Why it was not used."`
}

// Alternative is a layout that passes too.
type Alternative struct {
	Layout      LayoutReply   `json:"layout" doc:"The bars and stirrups."`
	Depth       units.Measure `json:"depth" doc:"Overall depth of the section."`
	SteelMass   units.Measure `json:"steel_mass" doc:"Mass of bars and stirrups."`
	Governing   Governing     `json:"governing" doc:"The check with the largest utilization."`
	WhyNotFirst string        `json:"why_not_first" doc:"What puts it behind."`
}

// Rejected is an arrangement that failed.
type Rejected struct {
	Arrangement string   `json:"arrangement" doc:"The arrangement in words."`
	Failed      []string `json:"failed" doc:"Every check that it failed, with both sides and the clause."`
}

// Cure is a change of the brief that was itself designed and found to pass.
type Cure struct {
	Change      string        `json:"change" doc:"What to change."`
	From        units.Measure `json:"from" doc:"Its value now."`
	To          units.Measure `json:"to" doc:"A value that does."`
	Governing   string        `json:"governing" doc:"The check that governs the beam so changed."`
	Utilization float64       `json:"utilization" doc:"Its utilization."`
}

// ScheduleLine is one mark of the bar schedule.
type ScheduleLine struct {
	Mark   string         `json:"mark" doc:"Mark of the bars."`
	Bar    string         `json:"bar" doc:"Size, as the catalog names it."`
	Count  int            `json:"count" doc:"Number of bars."`
	Shape  string         `json:"shape" doc:"Shape of the bar."`
	Length *units.Measure `json:"length,omitzero" doc:"Cut length of one. Absent with demands given directly."`
	Mass   units.Measure  `json:"mass" doc:"Mass of all, from the catalog's mass a length."`
}

// Quantities of a beam.
type Quantities struct {
	SteelMass        units.Measure  `json:"steel_mass" doc:"Mass of bars and stirrups."`
	StirrupMass      units.Measure  `json:"stirrup_mass" doc:"Mass of the stirrups, part of steel_mass."`
	Concrete         units.Measure  `json:"concrete" doc:"Volume of the concrete."`
	Form             units.Measure  `json:"form" doc:"Area of formwork: soffit and both sides."`
	SteelPerConcrete units.Measure  `json:"steel_per_concrete" doc:"Mass of steel in a volume of concrete."`
	PerLength        *units.Measure `json:"per_length,omitzero" doc:"Length that the quantities are for, with demands given directly. Absent: the whole beam."`
}
