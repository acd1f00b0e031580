package wire

import "soffit.example/units"

// StrengthsRequest asks for the strengths of a bare section.
type StrengthsRequest struct {
	Code     string           `json:"code" validate:"min=1,max=60" doc:"Id of a design code, as /v1/codes lists them."`
	ReportIn *string          `json:"report_in,omitzero" validate:"omitnil,oneof=us si" doc:"Units of the reply. Default: those of the design code."`
	Section  Section          `json:"section" doc:"Outline of the concrete section."`
	Concrete Concrete         `json:"concrete" doc:"The concrete as specified."`
	Bending  *string          `json:"bending,omitzero" validate:"omitnil,oneof=positive negative" doc:"Sense of bending; positive has tension at the bottom. Default: positive."`
	Layers   []SteelLayer     `json:"layers" validate:"min=1,max=40,dive" doc:"Longitudinal steel by layer."`
	Stirrups *SectionStirrups `json:"stirrups,omitzero" doc:"Transverse steel. Default: none."`
	Bent     *SectionBent     `json:"bent,omitzero" doc:"Longitudinal steel bent across the web. Default: none."`
	Demand   *Demand          `json:"demand,omitzero" doc:"Factored forces to be judged. Default: none, and verdicts are not-applicable."`

	DisplacedConcrete *string  `json:"displaced_concrete,omitzero" validate:"omitnil,oneof=deduct ignore" doc:"Whether the concrete that compression bars displace is deducted. Default: deduct."`
	Grade60Yield      *string  `json:"grade60_yield_strain,omitzero" validate:"omitnil,oneof=exact rounded" doc:"Yield strain fy/Es, or rounded where the code permits it. Default: exact."`
	ShearRow          *string  `json:"shear_row,omitzero" validate:"omitnil,oneof=larger a b" doc:"Which of two permitted expressions for the concrete's shear strength is used. Default: larger."`
	ShearMethod       *string  `json:"shear_method,omitzero" validate:"omitnil,oneof=simplified detailed" doc:"Expression for the concrete's shear strength in editions that have both. Default: simplified."`
	TorsionAngle      *float64 `json:"torsion_angle,omitzero" validate:"omitnil,min=10,max=80" doc:"Angle of the compression diagonals that carry torsion with the axis of the beam, in degrees, and within the code's own limits. Default: the code's usual one."`
}

// SteelLayer is longitudinal steel at one depth.
type SteelLayer struct {
	Area  units.Area   `json:"area" doc:"Area of the layer, above zero."`
	Depth units.Length `json:"depth" doc:"Depth of its centroid from the top face, whichever the sense of bending."`
	Yield units.Stress `json:"yield" doc:"Yield strength."`
}

// SectionStirrups is transverse steel at a section.
type SectionStirrups struct {
	Area     units.Area    `json:"area" doc:"Area of all legs that cross one shear crack at one stirrup."`
	Spacing  units.Length  `json:"spacing" doc:"Spacing along the span."`
	Yield    units.Stress  `json:"yield" doc:"Yield strength."`
	Cover    *units.Length `json:"cover,omitzero" doc:"Clear cover to the stirrup. Needed, as diameter is, where a torque must be designed for."`
	Diameter *units.Length `json:"diameter,omitzero" doc:"Diameter of the stirrup bar. Needed where a torque must be designed for."`
	Across   *units.Length `json:"across,omitzero" doc:"Greatest distance between legs across the web. Default: not known, and not judged."`
	Legs     *int          `json:"legs,omitzero" validate:"omitnil,min=2,max=12" doc:"Legs that area is of. Default: 2."`
	Angle    *float64      `json:"angle,omitzero" validate:"omitnil,min=15,max=90" doc:"Angle of the legs with the axis of the beam, in degrees, leaning against the shear, and within the code's own limits. Default: 90."`
	Form     *string       `json:"form,omitzero" validate:"omitnil,oneof=closed open" doc:"Whether the stirrup is closed; torsion counts closed ones alone. Default: closed."`
}

// SectionBent is longitudinal steel bent across the web at a section.
type SectionBent struct {
	Area    units.Area    `json:"area" doc:"Area of the bars bent at one place."`
	Yield   units.Stress  `json:"yield" doc:"Yield strength."`
	Angle   float64       `json:"angle" validate:"min=15,max=90" doc:"Angle of the slope with the axis of the beam, in degrees, and within the code's own limits."`
	Spacing *units.Length `json:"spacing,omitzero" doc:"Distance between places where as many bars are bent. Default: a single place."`
}

// FitsRequest asks how bars lie in a stirrup.
type FitsRequest struct {
	Code      string        `json:"code" validate:"min=1,max=60" doc:"Id of a design code, as /v1/codes lists them; its clear distances are required."`
	ReportIn  *string       `json:"report_in,omitzero" validate:"omitnil,oneof=us si" doc:"Units of the reply. Default: those of the design code."`
	Width     units.Length  `json:"width" doc:"Width of the form, 50 mm to 10 m."`
	Depth     units.Length  `json:"depth" doc:"Overall depth of the form, 50 mm to 10 m."`
	Cover     units.Length  `json:"cover" doc:"Clear cover to the stirrup at the sides and faces."`
	Stirrup   StirrupSize   `json:"stirrup" doc:"The stirrup that the bars lie in. All bars are of its catalog."`
	Aggregate *units.Length `json:"aggregate,omitzero" doc:"Nominal maximum aggregate size, above zero. Absent: the rule about it is not applied, and notes say so."`
	Layers    []BarLayer    `json:"layers" validate:"min=1,max=4,dive" doc:"Layers of bars, the first nearest the face."`
	Corner    *string       `json:"corner,omitzero" validate:"omitnil,oneof=seated tucked" doc:"Whether a corner bar sits on the stirrup's leg at the bend's tangent point or is pushed into the bend. Default: seated."`
}

// StirrupSize names a stirrup.
type StirrupSize struct {
	Catalog string `json:"catalog" validate:"min=1,max=60" doc:"Id of a bar catalog, as /v1/bars lists them."`
	Size    string `json:"size" validate:"min=1,max=20" doc:"Size, as the catalog names it."`
}

// BarLayer is a layer of like bars.
type BarLayer struct {
	Size    string `json:"size" validate:"min=1,max=20" doc:"Size, as the catalog names it."`
	Count   int    `json:"count" validate:"min=1,max=200" doc:"Number of bars."`
	Bundled *int   `json:"bundled,omitzero" validate:"omitnil,min=1,max=4" doc:"Bars in contact in each bundle; count is a multiple of it. Default: 1, single bars."`
}
