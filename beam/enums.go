package beam

import (
	"fmt"

	"soffit.example/beam/statics"
)

// Every enumeration starts at one; zero means "not stated". The text forms
// are the words of the JSON door.

// Shape is the outline of a section.
type Shape uint8

const (
	Rectangular Shape = iota + 1
	Tee               // a web with a flange at the top on both sides
	Ell               // a web with a flange at the top on one side
	InvertedTee       // a web with ledges at the bottom on both sides
	Polygon           // any outline, with hollows or without
)

// What a support holds; the words of package statics, for convenience.
const (
	Pinned = statics.Pinned
	Roller = statics.Roller
	Fixed  = statics.Fixed
	Free   = statics.Free
)

// Exposure classes, from which the cover follows.
type Exposure uint8

const (
	Interior Exposure = iota + 1 // not exposed to weather or in contact with ground
	Weather                      // exposed to weather, or formed and in contact with ground
	Ground                       // cast against and permanently in contact with ground
)

// ConcreteKind is the weight class of the concrete.
type ConcreteKind uint8

const (
	Normalweight ConcreteKind = iota + 1
	SandLightweight
	AllLightweight
	FineBlend   // lightweight coarse aggregate, fine aggregate in part normalweight
	CoarseBlend // normalweight fine aggregate, coarse aggregate in part normalweight
)

// Coating of the bars.
type Coating uint8

const (
	Uncoated Coating = iota + 1
	Epoxy
	Galvanized
)

// LoadCase is the origin of a load.
type LoadCase uint8

const (
	Dead LoadCase = iota + 1
	Live
	RoofLive
	Snow
	Rain
	Wind
	Earthquake
)

// LoadCases lists every case in order.
func LoadCases() []LoadCase {
	return []LoadCase{Dead, Live, RoofLive, Snow, Rain, Wind, Earthquake}
}

// LoadShape is how a load is spread along a span, and which fields of Load
// place and size it.
type LoadShape uint8

const (
	Uniform       LoadShape = iota + 1 // Intensity, from end to end
	Partial                            // Intensity, From, To; IntensityEnd where it Varies
	PointLoad                          // Force, At
	Couple                             // Moment, At
	Torque                             // Moment, At, Path
	UniformTorque                      // Moment, the total over the span, evenly spread: a torque a length times the span; Path
)

// TorquePath says why a torque acts, which decides whether it may be shed.
type TorquePath uint8

const (
	EquilibriumTorque   TorquePath = iota + 1 // needed for equilibrium: nothing else can carry it
	CompatibilityTorque                       // from the twist that neighbours impose: they can carry the load without it
)

// Attachment says what the beam carries that deflection could harm.
type Attachment uint8

const (
	NothingAttached Attachment = iota + 1
	Robust                     // attached, not likely to be damaged
	Fragile                    // attached, likely to be damaged
)

// Preference is how feasible layouts are ranked.
type Preference uint8

const (
	LeastSteel  Preference = iota + 1 // least mass of bars and stirrups
	FewestBars                        // fewest longitudinal bars, then least mass
	OneSize                           // one longitudinal size throughout, then least mass
	Shallowest                        // least overall depth, then least mass
	FewestMarks                       // fewest different bars and stirrup zones, then least mass
)

// ShearRow picks between two expressions for the concrete's shear strength
// where a standard permits either.
type ShearRow uint8

const (
	LargerRow ShearRow = iota + 1
	RowA
	RowB
)

// ShearMethod picks between a simplified and a detailed expression.
type ShearMethod uint8

const (
	SimplifiedShear ShearMethod = iota + 1
	DetailedShear
)

// Sense is the sign of a bending moment.
type Sense uint8

const (
	Positive Sense = iota + 1 // sagging: tension at the bottom
	Negative                  // hogging: tension at the top
)

// Face is a face of the beam that bars lie at.
type Face uint8

const (
	Bottom Face = iota + 1
	Top
	Side // both side faces, between top and bottom steel
)

// TensionFace is the face in tension under a moment of sense s.
func (s Sense) TensionFace() Face {
	if s == Negative {
		return Top
	}
	return Bottom
}

// Opposite is the other one of top and bottom.
func (f Face) Opposite() Face {
	if f == Top {
		return Bottom
	}
	return Top
}

// Verdict is the answer for a whole beam.
type Verdict uint8

const (
	Satisfied   Verdict = iota + 1 // every judged limit state is met
	Unsatisfied                    // the input is sound, the beam is not
	OutOfScope                     // a scope rule says that the method does not apply
)

// Outcome is the answer of a single check.
type Outcome uint8

const (
	Pass Outcome = iota + 1
	Fail
	NotApplicable
	NotJudged // within the standard, not within this version or this input; never counted as passed
)

var (
	shapeWords       = words{"rectangular", "tee", "ell", "inverted-tee", "polygon"}
	exposureWords    = words{"interior", "weather", "ground"}
	kindWords        = words{"normalweight", "sand-lightweight", "all-lightweight", "fine-blend", "coarse-blend"}
	coatingWords     = words{"none", "epoxy", "galvanized"}
	caseWords        = words{"dead", "live", "roof-live", "snow", "rain", "wind", "earthquake"}
	loadShapeWords   = words{"uniform", "partial", "point", "couple", "torque", "uniform-torque"}
	torquePathWords  = words{"equilibrium", "compatibility"}
	attachmentWords  = words{"none", "robust", "fragile"}
	preferenceWords  = words{"least-steel", "fewest-bars", "one-size", "shallowest", "fewest-marks"}
	shearRowWords    = words{"larger", "a", "b"}
	shearMethodWords = words{"simplified", "detailed"}
	senseWords       = words{"positive", "negative"}
	faceWords        = words{"bottom", "top", "side"}
	verdictWords     = words{"satisfied", "unsatisfied", "out-of-scope"}
	outcomeWords     = words{"pass", "fail", "not-applicable", "not-judged"}
)

// words are the text forms of an enumeration that starts at one.
type words []string

func (w words) text(i uint8) string {
	if i == 0 || int(i) > len(w) {
		return ""
	}
	return w[i-1]
}

func (w words) parse(s string) (uint8, error) {
	for i, word := range w {
		if word == s {
			return uint8(i + 1), nil
		}
	}
	return 0, fmt.Errorf("%q is not one of %v", s, []string(w))
}
