package service

import (
	"encoding"
	"fmt"
	"strings"

	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/service/internal/strict"
	"soffit.example/service/internal/wire"
	"soffit.example/units"
)

// intake turns requests into what package beam takes, and notes what is
// missing or contradicts itself. Ranges of quantities are package beam's.
type intake struct {
	faults *strict.Faults
	system units.System // in which faults say values
}

// intakeFor is an intake that speaks in the units of a design code; the code
// may be nil.
func intakeFor(code beam.Code, faults *strict.Faults) *intake {
	in := &intake{faults: faults}
	if code != nil {
		in.system = code.Edition().System
	}
	return in
}

func (in *intake) fault(path, allowed, format string, args ...any) {
	in.faults.Add(strict.Fault{Path: path, Detail: strict.Subject(path) + " " + fmt.Sprintf(format, args...), Allowed: allowed})
}

// value is what an optional member says, or zero.
func value[T any](given *T) T {
	var v T
	if given != nil {
		v = *given
	}
	return v
}

type quantity interface{ Amount() units.Amount }

// above takes an optional quantity for which zero means that it is not given,
// so that a zero that is given must not pass for one.
func above[Q quantity](in *intake, path string, given *Q) Q {
	v := value(given)
	if given != nil && !(v.Amount().SI() > 0) {
		in.fault(path, "above zero", "is %s; it must be above zero", in.system.Format(v.Amount()))
	}
	return v
}

// word reads an optional word of an enumeration. The ranges checked before
// let no unknown word through, save with a fault of its own.
func word[E any, P interface {
	*E
	encoding.TextUnmarshaler
}](given *string) E {
	var e E
	if given == nil || P(&e).UnmarshalText([]byte(*given)) != nil {
		var none E
		return none
	}
	return e
}

// brief converts a brief that stands at a place of the request.
func (in *intake) brief(w *wire.Brief, at string) beam.Brief {
	b := beam.Brief{
		Reference:     w.Reference,
		Section:       in.section(&w.Section, at+"/section"),
		Concrete:      in.concrete(&w.Concrete, at+"/concrete"),
		Reinforcement: in.reinforcement(&w.Reinforcement, at+"/reinforcement"),
		Exposure:      word[beam.Exposure](w.Exposure),
		Cover:         above(in, at+"/cover", w.Cover),
		Spans:         w.Spans,
		NoSelfWeight:  w.SelfWeight != nil && !*w.SelfWeight,
		Braced:        above(in, at+"/braced", w.Braced),
		Readings:      readings(w.DisplacedConcrete, w.Grade60Yield, w.ShearRow, w.ShearMethod, w.Corner),
	}
	b.Readings.TorsionAngle, b.Readings.CountSideBars = value(w.TorsionAngle), value(w.CountSideBars)
	for i := range w.Supports {
		b.Supports = append(b.Supports, support(&w.Supports[i]))
	}
	for i := range w.Loads {
		b.Loads = append(b.Loads, in.load(&w.Loads[i], fmt.Sprintf("%s/loads/%d", at, i)))
	}
	for i := range w.Demands {
		b.Demands = append(b.Demands, in.demand(&w.Demands[i], i, fmt.Sprintf("%s/demands/%d", at, i)))
	}
	if v := w.Serviceability; v != nil {
		b.Serviceability = beam.Serviceability{Attached: word[beam.Attachment](v.Attached), Months: value(v.Months)}
	}
	if v := w.Preferences; v != nil {
		b.Preferences = in.preferences(v, at+"/preferences")
	}
	return b
}

func (in *intake) concrete(w *wire.Concrete, at string) beam.Concrete {
	return beam.Concrete{
		Strength:  w.Strength,
		Density:   above(in, at+"/density", w.Density),
		Kind:      word[beam.ConcreteKind](w.Kind),
		Aggregate: above(in, at+"/aggregate", w.Aggregate),
		Splitting: above(in, at+"/splitting", w.Splitting),
		Normal:    value(w.Normal),
		Fibres:    value(w.Fibres),
	}
}

func (in *intake) reinforcement(w *wire.Reinforcement, at string) beam.Reinforcement {
	in.catalogID(w.Catalog, at+"/catalog")
	return beam.Reinforcement{
		Catalog:      w.Catalog,
		Yield:        w.Yield,
		StirrupYield: above(in, at+"/stirrup_yield", w.StirrupYield),
		Coating:      word[beam.Coating](w.Coating),
	}
}

// supportKinds are the words of the supports.
func supportKinds() []statics.SupportKind {
	return []statics.SupportKind{statics.Pinned, statics.Roller, statics.Fixed, statics.Free}
}

func support(w *wire.Support) beam.Support {
	s := beam.Support{Width: value(w.Width), Hung: value(w.Hung)}
	for _, k := range supportKinds() {
		if k.String() == w.Kind {
			s.Kind = k
		}
	}
	return s
}

// member is a member that belongs to things of some kinds alone.
type member struct {
	name, what string // what: it is, with an example
	given      bool
}

const (
	aLength   = `a length, e.g. "12 ft" or "3.5 m"`
	aSize     = `a length, e.g. "14 in" or "350 mm"`
	aLineLoad = `a line load, e.g. "1.2 kip/ft" or "18 kN/m"`
	aForce    = `a force, e.g. "20 kip" or "90 kN"`
	aMoment   = `a moment, e.g. "50 kip-ft" or "70 kN-m"`
)

// rule says which members things of a kind need, and which others they may
// have.
type rule struct{ needs, may string }

// belong notes which members a thing lacks of those that its rule needs, and
// which are given that it does not have.
func (in *intake) belong(at, thing string, r rule, members []member) {
	for _, m := range members {
		needed := hasWord(r.needs, m.name)
		switch {
		case needed && !m.given:
			in.fault(at+"/"+m.name, m.what, "is missing; %s needs it", thing)
		case m.given && !needed && !hasWord(r.may, m.name):
			in.fault(at+"/"+m.name, "", "does not belong to %s, which has %s", thing, listed(r.needs+" "+r.may))
		}
	}
}

// loadRules are the rules of loads by shape, for the members that place and
// size them. A shape that is not known has a fault of its own.
var loadRules = [...]rule{
	0:                  {may: "from to at intensity intensity_end force moment path"},
	beam.Uniform:       {needs: "intensity"},
	beam.Partial:       {needs: "from to intensity", may: "intensity_end"},
	beam.PointLoad:     {needs: "at force"},
	beam.Couple:        {needs: "at moment"},
	beam.Torque:        {needs: "at moment", may: "path"},
	beam.UniformTorque: {needs: "moment", may: "path"},
}

func (in *intake) load(w *wire.Load, at string) beam.Load {
	l := beam.Load{
		Case: word[beam.LoadCase](&w.Case), Shape: word[beam.LoadShape](&w.Shape), Span: value(w.Span),
		From: value(w.From), To: value(w.To), At: value(w.At),
		Intensity: value(w.Intensity), IntensityEnd: value(w.IntensityEnd), Varies: w.IntensityEnd != nil,
		Force: value(w.Force), Moment: value(w.Moment), Hung: value(w.Hung),
		Path: word[beam.TorquePath](w.Path),
	}
	switch {
	case w.Sustained != nil:
		l.Sustained = *w.Sustained
	case l.Case == beam.Dead:
		l.Sustained = 1
	}
	in.belong(at, "a "+w.Shape+" load", loadRules[l.Shape], []member{
		{"from", aLength, w.From != nil},
		{"to", aLength, w.To != nil},
		{"at", aLength, w.At != nil},
		{"intensity", aLineLoad, w.Intensity != nil},
		{"intensity_end", aLineLoad, w.IntensityEnd != nil},
		{"force", aForce, w.Force != nil},
		{"moment", aMoment, w.Moment != nil},
		{"path", "", w.Path != nil},
	})
	return l
}

func hasWord(list, name string) bool {
	for w := range strings.FieldsSeq(list) {
		if w == name {
			return true
		}
	}
	return false
}

func (in *intake) demand(w *wire.Demand, i int, at string) beam.Demand {
	if w.Moment == nil && w.Shear == nil && w.Torque == nil && w.Axial == nil {
		in.fault(at, "at least one of moment, shear, torque, axial", "has no force")
	}
	d := beam.Demand{Name: w.Name, Moment: value(w.Moment), Shear: value(w.Shear), Torque: value(w.Torque), Axial: value(w.Axial)}
	d.Path = word[beam.TorquePath](w.Path)
	if w.Path != nil && w.Torque == nil {
		in.fault(at+"/path", "", "belongs to a torque, and none is given")
	}
	if d.Name == "" {
		d.Name = fmt.Sprintf("demand %d", i+1)
	}
	return d
}

func (in *intake) preferences(w *wire.Preferences, at string) beam.Preferences {
	return beam.Preferences{
		Bars: w.Bars, Stirrups: w.Stirrups,
		MaxLayers: value(w.MaxLayers), MaxLegs: value(w.MaxLegs), MaxZones: value(w.MaxZones),
		Mixed: value(w.Mixed), Bundles: value(w.Bundles), Depths: w.Depths, Prefer: word[beam.Preference](w.Prefer),
		SpacingBy: above(in, at+"/spacing_step", w.SpacingStep), KeepBest: value(w.Alternatives),
		NoCures: w.Cures != nil && !*w.Cures,
	}
}

func readings(displaced, yield, row, method, corner *string) beam.Readings {
	return beam.Readings{
		IgnoreDisplaced: value(displaced) == "ignore",
		RoundedYield:    value(yield) == "rounded",
		ShearRow:        word[beam.ShearRow](row),
		ShearMethod:     word[beam.ShearMethod](method),
		TuckedCorner:    value(corner) == "tucked",
	}
}
