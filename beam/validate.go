package beam

import (
	"errors"
	"fmt"
	"math"
	"strings"

	"soffit.example/bars"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// bounds are the physical bounds of a brief, in round numbers of each system.
// They belong to no design code: they are wide enough for any beam that is
// built and narrow enough that a slipped unit is caught.
type bounds struct {
	leastSide, mostSide         units.Length
	leastWeb                    units.Length // below a flange
	leastStrength, mostStrength units.Stress
	leastYield, mostYield       units.Stress
	leastDensity, mostDensity   units.Density
	mostAggregate, mostCover    units.Length
	leastSpan, mostSpan         units.Length
	leastStep, mostStep         units.Length
	mostIntensity               units.LineLoad
	mostForce                   units.Force
	mostMoment                  units.Moment
}

var boundsIn = [...]bounds{
	units.SI: {
		units.Millimetre.Of(50), units.Millimetre.Of(10_000), units.Millimetre.Of(0.2),
		units.Megapascal.Of(1), units.Megapascal.Of(250),
		units.Megapascal.Of(100), units.Megapascal.Of(1500),
		units.KilogramPerCubicMetre.Of(500), units.KilogramPerCubicMetre.Of(5000),
		units.Millimetre.Of(200), units.Millimetre.Of(300),
		units.Millimetre.Of(100), units.Millimetre.Of(200_000),
		units.Millimetre.Of(1), units.Millimetre.Of(300),
		units.KilonewtonPerMetre.Of(1e5), units.Kilonewton.Of(1e6), units.KilonewtonMetre.Of(1e7),
	},
	units.US: {
		units.Inch.Of(2), units.Inch.Of(400), units.Inch.Of(0.01),
		units.KSI.Of(0.15), units.KSI.Of(36),
		units.KSI.Of(15), units.KSI.Of(200),
		units.PoundPerCubicFoot.Of(30), units.PoundPerCubicFoot.Of(300),
		units.Inch.Of(8), units.Inch.Of(12),
		units.Inch.Of(4), units.Inch.Of(8000),
		units.Inch.Of(0.05), units.Inch.Of(12),
		units.KipPerFoot.Of(7000), units.Kip.Of(200_000), units.KipFoot.Of(7e6),
	},
}

const (
	mostLoads       = 1000
	mostDemands     = 1000
	mostMonths      = 1200
	mostDepths      = 50
	mostAlternative = 50
	mostLegs        = 12
	mostBundled     = 4
)

// faults collects everything wrong with an input, in the units of system.
type faults struct {
	system units.System
	bounds
	list []Fault
}

func newFaults(system units.System) faults { return faults{system: system, bounds: boundsIn[system]} }

func (f *faults) add(path, allowed, format string, args ...any) {
	f.list = append(f.list, Fault{Path: path, Detail: fmt.Sprintf(format, args...), Allowed: allowed})
}

// addNew adds a fault unless its field, or what holds it, has one already.
func (f *faults) addNew(more Fault) {
	for _, old := range f.list {
		if old.Path == more.Path || strings.HasPrefix(more.Path, old.Path+"/") {
			return
		}
	}
	f.list = append(f.list, more)
}

// within reports a quantity outside [least, most], or not finite.
func (f *faults) within(path, what string, v, least, most units.Amount) bool {
	x := v.SI()
	if x >= least.SI() && x <= most.SI() && (x == 0 || math.Abs(x) >= tiny) {
		return true
	}
	said := f.system.Format(v)
	if math.IsNaN(x) || math.IsInf(x, 0) {
		said = "not a finite number"
	}
	f.add(path, f.system.Format(least)+" to "+f.system.Format(most), "%s is %s", what, said)
	return false
}

// tiny is the magnitude, in SI units, below which a value other than zero is
// taken for a slip: it could not be meant and would only lose digits.
const tiny = 1e-9

// positive is within (0, most].
func (f *faults) positive(path, what string, v, most units.Amount) bool {
	if x := v.SI(); x >= tiny && x <= most.SI() {
		return true
	}
	f.add(path, "above zero, to "+f.system.Format(most), "%s is %s", what, f.system.Format(v))
	return false
}

// Angles of the diagonals of the space truss that any standard allows.
const leastDiagonal, mostDiagonal = 10.0, 80.0

// angle reports an angle in degrees outside [least, most].
func (f *faults) angle(path string, a, least, most float64) {
	if !(a >= least && a <= most) {
		f.add(path, fmt.Sprintf("%g to %g degrees", least, most), "angle is %g degrees", a)
	}
}

func (f *faults) count(path, what string, v, least, most int) {
	if v < least || v > most {
		f.add(path, fmt.Sprintf("%d to %d", least, most), "%s is %d", what, v)
	}
}

// word reports an enumeration that is neither stated nor known.
func (f *faults) word(path, what string, given string, zero bool, w words) {
	if given == "" && !zero {
		f.add(path, strings.Join(w, ", "), "%s is not one that is known", what)
	}
}

func (f *faults) err() error {
	if len(f.list) == 0 {
		return nil
	}
	return &InputError{Faults: f.list}
}

// check reports every fault of a brief that no code is needed to see.
func (b *Brief) check(f *faults, catalog bars.Catalog) {
	b.Section.check(f, len(b.Spans) > 0)
	f.within("/concrete/strength", "concrete strength", b.Concrete.Strength.Amount(), f.leastStrength.Amount(), f.mostStrength.Amount())
	if !b.Concrete.Density.IsZero() {
		f.within("/concrete/density", "concrete density", b.Concrete.Density.Amount(), f.leastDensity.Amount(), f.mostDensity.Amount())
	}
	f.word("/concrete/kind", "concrete kind", b.Concrete.Kind.String(), b.Concrete.Kind == 0, kindWords)
	b.Concrete.checkMix(f)
	if !b.Concrete.Aggregate.IsZero() {
		f.positive("/concrete/aggregate", "aggregate size", b.Concrete.Aggregate.Amount(), f.mostAggregate.Amount())
	}
	f.within("/reinforcement/yield", "yield strength", b.Reinforcement.Yield.Amount(), f.leastYield.Amount(), f.mostYield.Amount())
	if !b.Reinforcement.StirrupYield.IsZero() {
		f.within("/reinforcement/stirrup_yield", "stirrup yield strength", b.Reinforcement.StirrupYield.Amount(), f.leastYield.Amount(), f.mostYield.Amount())
	}
	f.word("/reinforcement/coating", "coating", b.Reinforcement.Coating.String(), b.Reinforcement.Coating == 0, coatingWords)
	f.word("/exposure", "exposure", b.Exposure.String(), b.Exposure == 0, exposureWords)
	if !b.Cover.IsZero() && f.positive("/cover", "cover", b.Cover.Amount(), f.mostCover.Amount()) && b.Section.Shape != Polygon &&
		!b.Cover.Scale(2).Less(b.Section.Width.Min(b.Section.Depth)) {
		f.add("/cover", "less than half the smaller side of the section", "cover is %s", f.system.Format(b.Cover.Amount()))
	}
	if !b.Braced.IsZero() {
		f.positive("/braced", "bracing spacing", b.Braced.Amount(), f.mostSpan.Amount())
	}
	f.word("/serviceability/attached", "attached construction", b.Serviceability.Attached.String(), b.Serviceability.Attached == 0, attachmentWords)
	f.count("/serviceability/months", "months", b.Serviceability.Months, 0, mostMonths)

	if b.Section.Shape == Polygon && len(b.Preferences.Depths) > 0 {
		f.add("/preferences/depths", "none with a polygon", "the outline of the section says its depth, and %d depths to try are given", len(b.Preferences.Depths))
	}
	b.checkActions(f)
	b.Preferences.check(f, catalog)
	f.word("/shear_row", "shear row", b.Readings.ShearRow.String(), b.Readings.ShearRow == 0, shearRowWords)
	if a := b.Readings.TorsionAngle; a != 0 {
		f.angle("/torsion_angle", a, leastDiagonal, mostDiagonal)
	}
	f.word("/shear_method", "shear method", b.Readings.ShearMethod.String(), b.Readings.ShearMethod == 0, shearMethodWords)
}

// checkActions sees to what acts on the beam: a member with loads, or demands.
func (b *Brief) checkActions(f *faults) {
	member := len(b.Spans) > 0 || len(b.Supports) > 0 || len(b.Loads) > 0
	switch {
	case member && len(b.Demands) > 0:
		f.add("/demands", "", "a brief carries either spans, supports and loads, or demands, not both")
		return
	case len(b.Demands) > 0:
		b.checkDemands(f)
		return
	case len(b.Spans) == 0:
		f.add("/spans", "one span", "spans are missing, and no demands are given in their place")
		return
	case len(b.Spans) > 1:
		f.add("/spans", "one span", "%d spans given; this version designs a single span", len(b.Spans))
		return
	}
	sound := f.within("/spans/0", "span", b.Spans[0].Amount(), f.leastSpan.Amount(), f.mostSpan.Amount())
	if len(b.Supports) != 2 {
		f.add("/supports", "2", "%d supports given for one span", len(b.Supports))
		return
	}
	kinds := true
	for i, s := range b.Supports {
		path := fmt.Sprintf("/supports/%d", i)
		if s.Kind < statics.Pinned || s.Kind > statics.Free {
			kinds = false
			f.add(path+"/kind", "pinned, roller, fixed, free", "support kind is not one that is known")
		}
		if sound {
			f.within(path+"/width", "support width", s.Width.Amount(), units.Length{}.Amount(), b.Spans[0].Scale(0.5).Amount())
		}
		if s.Kind == statics.Free && !s.Width.IsZero() {
			f.add(path+"/width", "0", "a free end has no width, and %s is given", f.system.Format(s.Width.Amount()))
		}
	}
	if kinds {
		// A span and a load of no consequence ask whether the beam is held.
		held := statics.Beam{Spans: []statics.Span{{Length: units.Metre.Of(1)}}, Supports: memberBeam(b).Supports}
		var m *statics.MechanismError
		if _, err := statics.Analyze(held, []statics.Load{{Case: Dead.String(), Shape: statics.Uniform{}}}); errors.As(err, &m) {
			f.list = append(f.list, analysisFault(err))
		}
	}
	if len(b.Loads) == 0 && b.NoSelfWeight {
		f.add("/loads", "", "there is no load: none is given and self-weight is excluded")
	}
	if len(b.Loads) > mostLoads {
		f.add("/loads", fmt.Sprintf("at most %d", mostLoads), "%d loads given", len(b.Loads))
		return
	}
	if sound {
		for i := range b.Loads {
			b.Loads[i].check(f, fmt.Sprintf("/loads/%d", i), b.Spans[0])
		}
	}
}

func (l *Load) check(f *faults, path string, span units.Length) {
	if l.Case.String() == "" {
		f.add(path+"/case", strings.Join(caseWords, ", "), "load case is missing or not known")
	}
	if l.Span < 0 || l.Span > 1 {
		f.add(path+"/span", "1, or absent for every span", "span is %d", l.Span)
	}
	if !(l.Sustained >= 0 && l.Sustained <= 1) {
		f.add(path+"/sustained", "0 to 1", "sustained share is %g", l.Sustained)
	}
	along := func(field string, at units.Length) {
		f.within(path+"/"+field, field, at.Amount(), units.Length{}.Amount(), span.Amount())
	}
	intensity := func(field string, w units.LineLoad) {
		f.within(path+"/"+field, "intensity", w.Amount(), f.mostIntensity.Neg().Amount(), f.mostIntensity.Amount())
	}
	moment := func(what string) {
		f.within(path+"/moment", what, l.Moment.Amount(), f.mostMoment.Neg().Amount(), f.mostMoment.Amount())
	}
	l.checkForeign(f, path)
	switch l.Shape {
	case Uniform:
		intensity("intensity", l.Intensity)
	case Partial:
		intensity("intensity", l.Intensity)
		if l.Varies {
			intensity("intensity_end", l.IntensityEnd)
		}
		along("from", l.From)
		along("to", l.To)
		if !l.From.Less(l.To) {
			f.add(path+"/to", "beyond from", "the load runs from %s to %s", f.system.Format(l.From.Amount()), f.system.Format(l.To.Amount()))
		}
	case PointLoad:
		f.within(path+"/force", "force", l.Force.Amount(), f.mostForce.Neg().Amount(), f.mostForce.Amount())
		along("at", l.At)
	case Couple:
		moment("couple")
		along("at", l.At)
	case Torque:
		moment("torque")
		along("at", l.At)
		f.word(path+"/path", "path of the torque", l.Path.String(), l.Path == 0, torquePathWords)
	case UniformTorque:
		moment("torque over the span")
		f.word(path+"/path", "path of the torque", l.Path.String(), l.Path == 0, torquePathWords)
	default:
		f.add(path+"/shape", strings.Join(loadShapeWords, ", "), "load shape is missing or not known")
	}
}

// checkForeign reports fields that say something of a load of another shape.
func (l *Load) checkForeign(f *faults, path string) {
	torque := l.Shape == Torque || l.Shape == UniformTorque
	at := l.Shape == PointLoad || l.Shape == Couple || l.Shape == Torque
	spread := l.Shape == Uniform || l.Shape == Partial
	for _, field := range [...]struct {
		name    string
		foreign bool
	}{
		{"from", l.Shape != Partial && !l.From.IsZero()},
		{"to", l.Shape != Partial && !l.To.IsZero()},
		{"at", !at && !l.At.IsZero()},
		{"intensity", !spread && !l.Intensity.IsZero()},
		{"intensity_end", l.Shape != Partial && (l.Varies || !l.IntensityEnd.IsZero())},
		{"force", l.Shape != PointLoad && !l.Force.IsZero()},
		{"moment", l.Shape != Couple && !torque && !l.Moment.IsZero()},
		{"path", !torque && l.Path != 0},
	} {
		if field.foreign && l.Shape.String() != "" {
			f.add(path+"/"+field.name, "", "%s does not belong to a %s load", field.name, l.Shape)
		}
	}
}

func (b *Brief) checkDemands(f *faults) {
	if len(b.Demands) > mostDemands {
		f.add("/demands", fmt.Sprintf("at most %d", mostDemands), "%d demands given", len(b.Demands))
		return
	}
	names := make(map[string]int, len(b.Demands))
	for i, d := range b.Demands {
		path := fmt.Sprintf("/demands/%d", i)
		if j, twice := names[d.Name]; twice {
			f.add(path+"/name", "a name of its own", "name %q is that of demand %d too", d.Name, j)
		}
		names[d.Name] = i
		f.within(path+"/moment", "moment", d.Moment.Amount(), f.mostMoment.Neg().Amount(), f.mostMoment.Amount())
		f.within(path+"/shear", "shear", d.Shear.Amount(), f.mostForce.Neg().Amount(), f.mostForce.Amount())
		f.within(path+"/torque", "torque", d.Torque.Amount(), f.mostMoment.Neg().Amount(), f.mostMoment.Amount())
		f.word(path+"/path", "path of the torque", d.Path.String(), d.Path == 0, torquePathWords)
		f.within(path+"/axial", "axial force", d.Axial.Amount(), f.mostForce.Neg().Amount(), f.mostForce.Amount())
	}
}

func (p *Preferences) check(f *faults, catalog bars.Catalog) {
	sizes := func(path string, names []string) {
		seen := make(map[string]bool, len(names))
		for i, n := range names {
			at := fmt.Sprintf("%s/%d", path, i)
			if _, err := catalog.Size(n); err != nil {
				f.add(at, strings.Join(sizeNames(catalog), ", "), "%v", err)
			}
			if seen[n] {
				f.add(at, "each size once", "%q is listed twice", n)
			}
			seen[n] = true
		}
	}
	if catalog.ID() != "" {
		sizes("/preferences/bars", p.Bars)
		sizes("/preferences/stirrups", p.Stirrups)
	}
	f.count("/preferences/max_layers", "most layers", p.MaxLayers, 0, MaxLayers)
	if p.MaxLegs != 0 {
		f.count("/preferences/max_legs", "most stirrup legs", p.MaxLegs, 2, mostLegs)
	}
	if p.MaxZones != 0 && p.MaxZones != 1 && p.MaxZones != 3 {
		f.add("/preferences/max_zones", "1, 3", "most stirrup zones is %d", p.MaxZones)
	}
	f.count("/preferences/bundles", "most bars in a bundle", p.Bundles, 0, mostBundled)
	if len(p.Depths) > mostDepths {
		f.add("/preferences/depths", fmt.Sprintf("at most %d", mostDepths), "%d depths given", len(p.Depths))
	}
	for i, d := range p.Depths {
		f.within(fmt.Sprintf("/preferences/depths/%d", i), "depth", d.Amount(), f.leastSide.Amount(), f.mostSide.Amount())
	}
	f.word("/preferences/prefer", "preference", p.Prefer.String(), p.Prefer == 0, preferenceWords)
	if !p.SpacingBy.IsZero() {
		f.within("/preferences/spacing_step", "spacing step", p.SpacingBy.Amount(), f.leastStep.Amount(), f.mostStep.Amount())
	}
	f.count("/preferences/alternatives", "alternatives", p.KeepBest, -1, mostAlternative)
}

// allowed reports preferred sizes that the code does not allow in their use.
func (f *faults) allowed(path string, names []string, use bars.Use, p *Problem) {
	for i, n := range names {
		size, err := p.Catalog.Size(n)
		if err != nil || p.Code.Allows(use, size) {
			continue // an unknown name is a fault already
		}
		var allowed []string
		for _, s := range p.Catalog.Sizes() {
			if p.Code.Allows(use, s) {
				allowed = append(allowed, s.Name)
			}
		}
		f.add(fmt.Sprintf("%s/%d", path, i), strings.Join(allowed, ", "), "%s does not allow %q as a %s", p.Code.Edition().ID, n, use)
	}
}

// analysisFault turns a refusal of the analysis, which the checks above
// should have foreseen, into a fault of the brief. A mechanism is the one
// they leave to it.
func analysisFault(err error) Fault {
	var m *statics.MechanismError
	if errors.As(err, &m) {
		return Fault{Path: "/supports", Detail: "the beam is not held: " + m.Motion, Allowed: "two supports that hold, or one fixed end"}
	}
	return Fault{Path: "/loads", Detail: err.Error()}
}

// sizeNames lists the sizes of a catalog.
func sizeNames(c bars.Catalog) []string {
	var out []string
	for _, s := range c.Sizes() {
		out = append(out, s.Name)
	}
	return out
}
