package wire

import "soffit.example/units"

// Brief is a beam to be designed.
type Brief struct {
	Reference string  `json:"reference,omitzero" validate:"max=200" doc:"The caller's mark for the beam, echoed in the reply."`
	Code      string  `json:"code" validate:"min=1,max=60" doc:"Id of a design code, as /v1/codes lists them."`
	ReportIn  *string `json:"report_in,omitzero" validate:"omitnil,oneof=us si" doc:"Units of the reply. Default: those of the design code."`
	Detail    *string `json:"detail,omitzero" validate:"omitnil,oneof=full" doc:"full adds its working to each check."`

	Section       Section       `json:"section" doc:"Outline of the concrete section."`
	Concrete      Concrete      `json:"concrete" doc:"The concrete as specified."`
	Reinforcement Reinforcement `json:"reinforcement" doc:"Where bars come from and how strong they are."`
	Exposure      *string       `json:"exposure,omitzero" validate:"omitnil,oneof=interior weather ground" doc:"What the concrete surface is exposed to, from which the cover follows; ground means cast against it. Needed unless cover is given."`
	Cover         *units.Length `json:"cover,omitzero" doc:"Clear cover to the outermost steel, above zero. Default: by the code's table for the exposure."`

	Spans      []units.Length `json:"spans,omitzero" validate:"omitnil,min=1,max=20" doc:"Distances between support centres, left to right. This version designs a single span."`
	Supports   []Support      `json:"supports,omitzero" validate:"omitnil,min=2,max=21,dive" doc:"Supports from left to right, one more than spans."`
	Loads      []Load         `json:"loads,omitzero" validate:"omitnil,max=200,dive" doc:"Unfactored loads by case."`
	SelfWeight *bool          `json:"self_weight,omitzero" doc:"false: the dead load given already holds the beam's own weight. Default: true, from the section and the density."`
	Pattern    *Pattern       `json:"pattern,omitzero" doc:"How live load is patterned over several spans. A single span is analysed the same way whatever is given."`

	Demands []Demand `json:"demands,omitzero" validate:"omitnil,min=1,max=200,dive" doc:"Factored forces from the caller's own analysis, in place of spans, supports and loads."`

	Braced         *units.Length   `json:"braced,omitzero" doc:"Greatest spacing of lateral bracing of the compression face, above zero. Default: taken as braced."`
	Serviceability *Serviceability `json:"serviceability,omitzero" doc:"What deflection must protect."`
	Preferences    *Preferences    `json:"preferences,omitzero" doc:"Steer the search; none of them relaxes a check."`

	DisplacedConcrete *string `json:"displaced_concrete,omitzero" validate:"omitnil,oneof=deduct ignore" doc:"Whether the concrete that compression bars displace is deducted. Default: deduct."`
	Grade60Yield      *string `json:"grade60_yield_strain,omitzero" validate:"omitnil,oneof=exact rounded" doc:"Yield strain fy/Es, or rounded where the code permits it. Default: exact."`
	ShearRow          *string `json:"shear_row,omitzero" validate:"omitnil,oneof=larger a b" doc:"Which of two permitted expressions for the concrete's shear strength is used. Default: larger."`
	ShearMethod       *string `json:"shear_method,omitzero" validate:"omitnil,oneof=simplified detailed" doc:"Expression for the concrete's shear strength in editions that have both. Default: simplified."`
	Corner            *string `json:"corner,omitzero" validate:"omitnil,oneof=seated tucked" doc:"Whether a corner bar sits on the stirrup's leg at the bend's tangent point or is pushed into the bend. Default: seated."`

	TorsionAngle  *float64 `json:"torsion_angle,omitzero" validate:"omitnil,min=10,max=80" doc:"Angle of the compression diagonals that carry torsion with the axis of the beam, in degrees, and within the code's own limits. Default: the code's usual one."`
	CountSideBars *bool    `json:"count_side_bars,omitzero" doc:"true: side-face bars count in bending by strain compatibility, where no torque needs them. Default: false."`
}

// Section is a concrete outline. Which members belong to it depends on shape:
// rectangular (width, depth), tee and ell (web_width, depth, flange_thickness,
// and either flange_width or slab; a tee may be isolated), inverted-tee
// (web_width, depth, flange_thickness, flange_width), polygon (outline, and
// voids if it is hollow).
type Section struct {
	Shape           string        `json:"shape" validate:"oneof=rectangular tee ell inverted-tee polygon" doc:"Shape of the outline, which decides what else belongs to it: rectangular (width, depth); tee and ell, with the flange at the top (web_width, depth, flange_thickness, and either flange_width or slab; a tee may be isolated); inverted-tee, with ledges at the bottom (web_width, depth, flange_thickness, flange_width); polygon (outline, and voids if it is hollow). Any may be a joist."`
	Width           *units.Length `json:"width,omitzero" doc:"Width of a rectangle, 50 mm to 10 m."`
	WebWidth        *units.Length `json:"web_width,omitzero" doc:"Width of the web of a flanged section, 50 mm to 10 m."`
	Depth           *units.Length `json:"depth,omitzero" doc:"Overall depth, 50 mm to 10 m; of a polygon it follows from the outline."`
	FlangeThickness *units.Length `json:"flange_thickness,omitzero" doc:"Thickness of the flange, or of the ledges of an inverted-tee; at least 50 mm, less than depth."`
	FlangeWidth     *units.Length `json:"flange_width,omitzero" doc:"Overall width of the flange, web included, as far as it works with the web: half of the rest on each side, of an ell all of it on the right. At most 10 m."`
	Slab            *Slab         `json:"slab,omitzero" doc:"The floor that a tee or an ell is cast with, from which the code finds the width that works with the web, in place of flange_width. Needs a span."`
	Isolated        *bool         `json:"isolated,omitzero" doc:"true: a tee of its own, whose flange gives it compression area only. Default: false, part of a floor."`
	Joist           *bool         `json:"joist,omitzero" doc:"true: a rib of a one-way joist floor. Default: false."`
	Outline         []Point       `json:"outline,omitzero" validate:"omitnil,min=3,max=200,dive" doc:"Corners of a polygon in order, either way round. Every level must cut it in one piece, and an upright strip in which the stirrups stand must run through from top to bottom."`
	Voids           [][]Point     `json:"voids,omitzero" validate:"omitnil,min=1,max=20,dive,min=3,max=200,dive" doc:"Hollows of a polygon: the corners of each in order, inside the outline and clear of it and of each other."`
}

// Slab is the floor that a beam is cast with.
type Slab struct {
	ClearLeft  *units.Length `json:"clear_left,omitzero" doc:"Clear distance to the next web on the left, above zero. Default: no slab there, as at the edge of a floor."`
	ClearRight *units.Length `json:"clear_right,omitzero" doc:"Clear distance to the next web on the right, above zero. Default: no slab there."`
}

// Point is a corner of an outline.
type Point struct {
	X units.Length `json:"x" doc:"To the right, from any origin that the section keeps to; within 100 m."`
	Y units.Length `json:"y" doc:"Upward, from the same origin; within 100 m."`
}

// Concrete is concrete as specified.
type Concrete struct {
	Strength  units.Stress   `json:"strength" doc:"Specified compressive strength, 1 MPa to 250 MPa and within the code's own limits."`
	Density   *units.Density `json:"density,omitzero" doc:"Density, 500 kg/m3 to 5000 kg/m3. Default: the code's usual value for the kind."`
	Kind      *string        `json:"kind,omitzero" validate:"omitnil,oneof=normalweight sand-lightweight all-lightweight fine-blend coarse-blend" doc:"Weight class. Default: normalweight."`
	Aggregate *units.Length  `json:"aggregate,omitzero" doc:"Nominal maximum aggregate size, above zero, at most 200 mm. Default: assumed and listed."`
	Splitting *units.Stress  `json:"splitting,omitzero" doc:"Average splitting tensile strength of a lightweight concrete, from tests, above zero. Default: not known. Codes that do not go by it say so."`
	Normal    *float64       `json:"normal_share,omitzero" validate:"omitnil,min=0,max=1" doc:"Share of normalweight aggregate, by absolute volume, in the fine part of a fine-blend or the coarse part of a coarse-blend concrete."`
	Fibres    *bool          `json:"fibres,omitzero" doc:"true: steel fibres as the code asks for them to stand in for least stirrups. Default: false."`
}

// Reinforcement says where bars come from.
type Reinforcement struct {
	Catalog      string        `json:"catalog" validate:"min=1,max=60" doc:"Id of a bar catalog, as /v1/bars lists them."`
	Yield        units.Stress  `json:"yield" doc:"Yield strength of longitudinal bars, 100 MPa to 1500 MPa and within the code's own limits."`
	StirrupYield *units.Stress `json:"stirrup_yield,omitzero" doc:"Yield strength of stirrups. Default: as yield."`
	Coating      *string       `json:"coating,omitzero" validate:"omitnil,oneof=none epoxy galvanized" doc:"Coating of the bars. Default: none."`
}

// Support is one support.
type Support struct {
	Kind  string        `json:"kind" validate:"oneof=pinned roller fixed free" doc:"What the support holds."`
	Width *units.Length `json:"width,omitzero" doc:"Width along the span. Default: zero, a point support."`
	Hung  *bool         `json:"hung,omitzero" doc:"true: the reaction pulls on the end region, as where the beam hangs or frames into a girder."`
}

// Load is one load of one case. Which members belong to it depends on shape:
// uniform (intensity), partial (intensity, from, to, and intensity_end if it
// varies), point (force, at), couple (moment, at), torque (moment, at, and
// path), uniform-torque (moment, the total over the span, and path).
type Load struct {
	Case         string          `json:"case" validate:"oneof=dead live roof-live snow rain wind earthquake" doc:"Origin of the load."`
	Shape        string          `json:"shape" validate:"oneof=uniform partial point couple torque uniform-torque" doc:"How the load is spread, which decides what else belongs to it: uniform (intensity); partial (intensity, from, to, and intensity_end if it varies); point (force, at); couple (moment, at); torque (moment, at, and path); uniform-torque (moment, the total over the span, and path)."`
	Span         *int            `json:"span,omitzero" validate:"omitnil,min=1,max=20" doc:"Number of the span from the left, from 1. Default: every span."`
	From         *units.Length   `json:"from,omitzero" doc:"Start of a partial load, from the span's left end."`
	To           *units.Length   `json:"to,omitzero" doc:"End of a partial load, beyond from."`
	At           *units.Length   `json:"at,omitzero" doc:"Position of a point load, couple or torque, from the span's left end."`
	Intensity    *units.LineLoad `json:"intensity,omitzero" doc:"Load a length, downward positive; of a partial load that varies, at from."`
	IntensityEnd *units.LineLoad `json:"intensity_end,omitzero" doc:"Load a length at to, of a partial load that varies."`
	Force        *units.Force    `json:"force,omitzero" doc:"Force, downward positive."`
	Moment       *units.Moment   `json:"moment,omitzero" doc:"Moment of a couple, clockwise positive; or of a torque about the beam's axis, clockwise positive as seen from the left end. Of a uniform-torque it is the total over the span: a torque a length times the span."`
	Sustained    *float64        `json:"sustained,omitzero" validate:"omitnil,min=0,max=1" doc:"Share of the load that stays. Default: 1 for dead loads, otherwise 0."`
	Hung         *bool           `json:"hung,omitzero" doc:"true: the load acts at or below the soffit."`
	Path         *string         `json:"path,omitzero" validate:"omitnil,oneof=equilibrium compatibility" doc:"Why a torque acts. equilibrium: nothing else can carry it. compatibility: it comes from the twist that neighbours impose, and part of it may be shed to them. Default: equilibrium."`
}

// Demand is one set of factored forces.
type Demand struct {
	Name   string        `json:"name,omitzero" validate:"max=100" doc:"Name of the combination."`
	Moment *units.Moment `json:"moment,omitzero" doc:"Bending moment, sagging positive."`
	Shear  *units.Force  `json:"shear,omitzero" doc:"Shear force."`
	Torque *units.Moment `json:"torque,omitzero" doc:"Torsional moment. Its sign does not matter."`
	Path   *string       `json:"path,omitzero" validate:"omitnil,oneof=equilibrium compatibility" doc:"Why the torque acts. equilibrium: nothing else can carry it. compatibility: part of it may be shed to neighbours. Default: equilibrium."`
	Axial  *units.Force  `json:"axial,omitzero" doc:"Axial force, compression positive."`
}

// Serviceability says what deflection must protect.
type Serviceability struct {
	Attached *string `json:"attached,omitzero" validate:"omitnil,oneof=none robust fragile" doc:"What the beam carries: nothing that deflection could harm, something not likely or something likely to be damaged."`
	Months   *int    `json:"months,omitzero" validate:"omitnil,min=1,max=1200" doc:"Age at which long-term deflection is wanted. Default: 60."`
}

// Preferences steer the search.
type Preferences struct {
	Bars         []string       `json:"bars,omitzero" validate:"omitnil,min=1,max=20,dive,min=1,max=20" doc:"Longitudinal sizes allowed. Default: all that the code allows."`
	Stirrups     []string       `json:"stirrups,omitzero" validate:"omitnil,min=1,max=20,dive,min=1,max=20" doc:"Stirrup sizes allowed. Default: the catalog's usual ones."`
	MaxLayers    *int           `json:"max_layers,omitzero" validate:"omitnil,min=1,max=4" doc:"Most layers of bars on a face. Default: 2."`
	MaxLegs      *int           `json:"max_legs,omitzero" validate:"omitnil,min=2,max=12" doc:"Most stirrup legs. Default: 4."`
	MaxZones     *int           `json:"max_zones,omitzero" validate:"omitnil,min=1,max=3" doc:"Most stirrup zones in a span, 1 or 3. Default: 3."`
	Mixed        *bool          `json:"mixed,omitzero" doc:"true: allow two neighbouring sizes on one face."`
	Bundles      *int           `json:"bundles,omitzero" validate:"omitnil,min=1,max=4" doc:"Most bars in contact in a bundle; 1: none. Default: 1."`
	Depths       []units.Length `json:"depths,omitzero" validate:"omitnil,min=1,max=20" doc:"Overall depths to try besides that of the section."`
	Prefer       *string        `json:"prefer,omitzero" validate:"omitnil,oneof=least-steel fewest-bars one-size shallowest fewest-marks" doc:"What feasible layouts are ranked by. Default: least-steel."`
	SpacingStep  *units.Length  `json:"spacing_step,omitzero" doc:"Stirrup spacings are multiples of this, 1 mm to 300 mm. Default: 1/2 in or 10 mm."`
	Alternatives *int           `json:"alternatives,omitzero" validate:"omitnil,min=1,max=50" doc:"Alternatives kept. Default: 3."`
	Cures        *bool          `json:"cures,omitzero" doc:"false: where nothing fits, do not look for changes of the brief that would do. Default: true."`
}

// CheckRequest is a layout to be judged against a brief.
type CheckRequest struct {
	Brief  Brief  `json:"brief" doc:"What the beam is for. Preferences are not used."`
	Layout Layout `json:"layout" doc:"The bars and stirrups to be judged, as /v1/designs returns them."`
}

// Layout is a set of bars and stirrups. Bars that must be listed and that
// there are none of are an empty list.
type Layout struct {
	Longitudinal []Row  `json:"longitudinal" validate:"max=40,dive" doc:"Groups of like bars."`
	Transverse   []Zone `json:"transverse,omitzero" validate:"max=40,dive" doc:"Runs of like stirrups. Default: none."`
	Bent         []Bent `json:"bent,omitzero" validate:"max=40,dive" doc:"Bars bent across the web to carry shear. Default: none."`
}

// Row is a group of like bars in one layer of one face.
type Row struct {
	Mark          string        `json:"mark,omitzero" validate:"max=40" doc:"Mark of the bars."`
	Bar           string        `json:"bar" validate:"min=1,max=20" doc:"Size, as the brief's catalog names it."`
	Count         int           `json:"count" validate:"min=1,max=200" doc:"Number of bars; of side bars, on each side face."`
	Face          string        `json:"face" validate:"oneof=bottom top side" doc:"Face at which the bars lie. Side bars have spacing, and no layer, flange, bundled, yield or in_compression."`
	Layer         *int          `json:"layer,omitzero" validate:"omitnil,min=1,max=20" doc:"Layer of the face, 1 nearest to it. Default: 1. Side bars have none."`
	Flange        *bool         `json:"flange,omitzero" doc:"true: the bars lie in the flange beside the web, at the level of the first layer, half of them on each side (an odd one more on the left), of an ell all on its one side."`
	Spacing       *units.Length `json:"spacing,omitzero" doc:"Of side bars, their vertical spacing, counted up from the highest layer at the bottom with more than one bar. Of bars in a flange, their spacing outward from the outermost bar of the web, or from the row listed before."`
	Bundled       *int          `json:"bundled,omitzero" validate:"omitnil,min=1,max=4" doc:"Bars in contact in each bundle; count is a multiple of it. Default: 1, single bars."`
	Yield         *units.Stress `json:"yield,omitzero" doc:"Yield strength of these bars. Default: that of the brief."`
	InCompression *bool         `json:"in_compression,omitzero" doc:"true: the bars are relied on as compression steel. Default: false, they hold stirrups."`
	From          *units.Length `json:"from,omitzero" doc:"Start along the beam. Default: the whole length."`
	To            *units.Length `json:"to,omitzero" doc:"End along the beam. Default: the whole length."`
	Start         *string       `json:"start,omitzero" validate:"omitnil,oneof=straight" doc:"How the left end stops."`
	End           *string       `json:"end,omitzero" validate:"omitnil,oneof=straight" doc:"How the right end stops."`
}

// Zone is a run of like stirrups, the first one half a spacing inside it.
type Zone struct {
	Mark    string        `json:"mark,omitzero" validate:"max=40" doc:"Mark of the stirrups."`
	Span    *int          `json:"span,omitzero" validate:"omitnil,min=1,max=20" doc:"Number of the span from the left, from 1. Absent with demands given directly."`
	Bar     string        `json:"bar" validate:"min=1,max=20" doc:"Size, as the brief's catalog names it."`
	Legs    int           `json:"legs" validate:"min=2,max=12" doc:"Vertical legs."`
	Spacing units.Length  `json:"spacing" doc:"Spacing along the span, above zero."`
	Count   *int          `json:"count,omitzero" validate:"omitnil,min=1,max=10000" doc:"Number of stirrups. Absent with demands given directly."`
	From    *units.Length `json:"from,omitzero" doc:"Start of the zone, from the span's left end. Default: the whole span."`
	To      *units.Length `json:"to,omitzero" doc:"End of the zone, from the span's left end. Default: the whole span."`
	Form    *string       `json:"form,omitzero" validate:"omitnil,oneof=closed open" doc:"Whether the stirrup is closed. Default: closed."`
	Angle   *float64      `json:"angle,omitzero" validate:"omitnil,min=15,max=90" doc:"Angle of the legs with the axis of the beam, in degrees, leaning against the shear, and within the code's own limits. Default: 90."`
}

// Bent is longitudinal bars bent across the web to carry shear there, where
// they count for shear alone.
type Bent struct {
	Mark    string        `json:"mark,omitzero" validate:"max=40" doc:"Mark of the bars."`
	Bar     string        `json:"bar" validate:"min=1,max=20" doc:"Size, as the brief's catalog names it."`
	Count   int           `json:"count" validate:"min=1,max=200" doc:"Bars bent at one place."`
	Span    *int          `json:"span,omitzero" validate:"omitnil,min=1,max=20" doc:"Number of the span from the left, from 1. Default: 1."`
	At      units.Length  `json:"at" doc:"Where the first slope crosses mid-depth, from the span's left end."`
	Angle   float64       `json:"angle" validate:"min=15,max=90" doc:"Angle of the slope with the axis of the beam, in degrees, and within the code's own limits."`
	Rises   string        `json:"rises" validate:"oneof=left right" doc:"End of the span towards which the bars rise."`
	Bends   *int          `json:"bends,omitzero" validate:"omitnil,min=1,max=200" doc:"Places, one spacing apart to the right, at which as many bars are bent. Default: 1."`
	Spacing *units.Length `json:"spacing,omitzero" doc:"Distance between those places; needed where there is more than one."`
}
