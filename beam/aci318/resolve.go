package aci318

import (
	"slices"

	"soffit.example/beam"
	"soffit.example/beam/statics"
)

// Ids of the assumptions that Settle answers.
const (
	assumeTensionControl = "flexure.tension-controlled"
	assumeLeastStirrups  = "shear.least-stirrups"
)

var (
	flexureChecks = []string{"flexure.positive", "flexure.negative"}
	shearChecks   = []string{"shear.strength"}
)

// Resolve fills what the brief left to the code and lists it, and reports
// values that the tables of chapters 19 and 20 do not know.
func (c Code) Resolve(b *beam.Brief, note *beam.Register) []beam.Fault {
	r := resolution{edition: c.e, b: b, note: note}
	r.concrete()
	r.reinforcement()
	r.flange()
	r.surroundings()
	r.actions()
	r.torsion()
	r.readings()
	r.shearReadings()
	r.method()
	return r.faults
}

// resolution is a brief on its way to being complete.
type resolution struct {
	*edition
	b      *beam.Brief
	note   *beam.Register
	faults []beam.Fault
}

func (r *resolution) fault(path, detail, allowed string) {
	r.faults = append(r.faults, beam.Fault{Path: path, Detail: detail, Allowed: allowed})
}

// assume lists something that holds as soon as it is chosen.
func (r *resolution) assume(id, assumed string, usedIn ...string) {
	r.note.Assume(beam.Assumption{ID: id, Assumed: assumed, UsedIn: slices.Clone(usedIn), Found: "a choice of reading: it holds as taken", Holds: true})
}

// confirm lists something that only the engineer can confirm.
func (r *resolution) confirm(id, assumed string, usedIn ...string) {
	r.note.Assume(beam.Assumption{ID: id, Assumed: assumed, UsedIn: slices.Clone(usedIn), Open: true})
}

// later lists something that Settle holds against the finished beam.
func (r *resolution) later(id, assumed string, usedIn ...string) {
	r.note.Assume(beam.Assumption{ID: id, Assumed: assumed, UsedIn: slices.Clone(usedIn)})
}

func (r *resolution) concrete() {
	c, m := &r.b.Concrete, &r.materials
	if c.Kind == 0 {
		c.Kind = beam.Normalweight
		r.confirm("concrete.kind", "normalweight concrete", append(shearChecks, "depth.minimum")...)
	}
	switch fault, wrong := r.densityFault(c); {
	case wrong:
		r.faults = append(r.faults, fault)
	case c.Density.IsZero():
		c.Density = m.density.Of(m.usualDensity)
		r.confirm("concrete.density", m.density.Format(c.Density)+", usual for normalweight concrete with its bars", "self-weight.section")
	}
	if c.Aggregate.IsZero() {
		c.Aggregate = r.lengthOf(m.usualAggregate)
		r.confirm("concrete.aggregate", "nominal maximum aggregate of "+r.length.Format(c.Aggregate), "spacing.clear", "aggregate.form-width", "aggregate.clear-spacing")
	}
}

func (r *resolution) reinforcement() {
	s := &r.b.Reinforcement
	if s.StirrupYield.IsZero() {
		s.StirrupYield = s.Yield
		r.confirm("reinforcement.stirrup-yield", "stirrups of the same yield strength as the bars, "+r.stress.Format(s.Yield), shearChecks...)
	}
	if used, capped := r.shearYield(s.StirrupYield); capped {
		r.assume("reinforcement.stirrup-yield-cap", "stirrups count with "+r.stress.Format(used)+" of their "+r.stress.Format(s.StirrupYield)+
			" ("+r.materials.yieldClause+")", "shear.strength", "shear.minimum-stirrups")
	}
	if s.Coating == 0 {
		s.Coating = beam.Uncoated
		r.confirm("reinforcement.coating", "uncoated bars", "development.anchorage")
	}
}

func (r *resolution) surroundings() {
	b := r.b
	switch {
	case b.Exposure == 0 && b.Cover.IsZero():
		r.fault("/exposure", "neither exposure nor cover is given, and the cover follows from one of them", "interior, weather, ground; or a cover")
	case b.Exposure == 0:
		b.Exposure = beam.Interior
		r.confirm("exposure.class", "interior exposure, as only the cover is given", "cover.stirrup", "cover.bar")
	}
	if b.Braced.IsZero() {
		r.confirm("bracing.compression-face", "the compression face is braced at no more than 50 times its width (9.2.3.1)", "bracing.spacing")
	}
	if b.Serviceability.Attached == 0 {
		b.Serviceability.Attached = beam.NothingAttached
		r.confirm("serviceability.attached", "the beam carries no construction likely to be damaged by deflection", "depth.minimum", "deflection.computed")
	}
	if b.Serviceability.Months == 0 {
		b.Serviceability.Months = 60
	}
}

// actions lists what is taken for granted of supports, loads and demands.
func (r *resolution) actions() {
	b := r.b
	if len(b.Demands) > 0 {
		sheared := false
		for i := range b.Demands {
			sheared = sheared || !b.Demands[i].Shear.IsZero()
		}
		if !sheared {
			r.confirm("demands.shear", "no demand carries shear: shear is taken as nil", shearChecks...)
		}
		r.confirm("demands.factored", "the demands are factored by 5.3, simultaneous, and those of the critical sections of 9.4",
			"flexure.positive", "flexure.negative", "shear.strength")
		return
	}
	strengths := append(flexureChecks[:len(flexureChecks):len(flexureChecks)], shearChecks...)
	hung, lives, laterals, wind, torque := false, 0, false, false, false
	for i := range b.Loads {
		l := &b.Loads[i]
		hung = hung || l.Hung
		if l.Case == beam.Live {
			lives++
		}
		wind = wind || l.Case == beam.Wind
		laterals = laterals || l.Case == beam.Wind || l.Case == beam.Earthquake
		torque = torque || l.Shape == beam.Torque || l.Shape == beam.UniformTorque
	}
	if len(b.Loads) == 0 {
		r.confirm("loads.none", "the beam carries nothing but its own weight: no load is given", strengths...)
	}
	if b.NoSelfWeight {
		r.confirm("loads.self-weight", "the dead load given holds the beam's own weight", strengths...)
	}
	if lives > 0 {
		r.confirm("loads.live", "live loads are as given: not reduced for area here, and those of one case act all together, even where one relieves another", strengths...)
	}
	if wind {
		r.confirm("loads.wind", "wind is at strength level (5.3.5 asks 1.6W of a service-level wind)", strengths...)
	}
	if laterals {
		r.confirm("loads.reversal", "wind and earthquake act with the same magnitude in both senses", strengths...)
	}
	if torque {
		r.confirm("supports.torsion", "every support holds the beam against twist", "torsion.threshold")
	}
	for i := range b.Supports {
		if b.Supports[i].Kind == statics.Fixed {
			r.confirm("supports.fixity", "fixed ends do not turn, and pinned ends and rollers turn freely; the joint is designed for the moment", strengths...)
			break
		}
	}
	for i := range b.Supports {
		s := &b.Supports[i]
		hung = hung || s.Hung
		if s.Width.IsZero() && s.Kind != statics.Free {
			r.confirm("supports.width", "supports without a stated width are points: their face is their centre",
				"flexure.positive", "flexure.negative", "shear.strength")
		}
	}
	if !hung {
		r.confirm("shear.direct-support", directSupport(b), shearChecks...)
	}
	if r.usesLiveFactor() {
		r.assume("loads.live-factor", "the live-load factor of 5.3.1(c) to (e) stays 1.0; the 0.5 of 5.3.3 is not used", "flexure.positive", "flexure.negative", "shear.strength")
	}
}

// usesLiveFactor reports whether a combination holds the live-load factor that
// 5.3.3 permits to halve.
func (r *resolution) usesLiveFactor() bool {
	loaded := loadedCases(r.b)
	if !loaded[beam.Live] {
		return false
	}
	for c := beam.RoofLive; c <= beam.Earthquake; c++ {
		if loaded[c] {
			return true
		}
	}
	return false
}

func (r *resolution) readings() {
	b := r.b
	g := &b.Readings
	switch {
	case g.IgnoreDisplaced:
		r.assume("reading.displaced-concrete", "the concrete that compression bars displace is not deducted", flexureChecks...)
	default:
		r.assume("reading.displaced-concrete", "the concrete that compression bars displace is deducted", flexureChecks...)
	}
	switch grade60 := r.isGrade60(b.Reinforcement.Yield); {
	case g.RoundedYield && grade60:
		r.assume("reading.yield-strain", "the yield strain of Grade 60 bars is rounded to 0.002 (21.2.2.1)", "flexure.strain.positive", "flexure.strain.negative")
	case g.RoundedYield:
		r.assume("reading.yield-strain", "the yield strain is fy/Es: 21.2.2.1 permits its rounding for Grade 60 only", "flexure.strain.positive", "flexure.strain.negative")
	default:
		r.assume("reading.yield-strain", "the yield strain is fy/Es, not rounded", "flexure.strain.positive", "flexure.strain.negative")
	}
	if g.ShearRow == 0 {
		g.ShearRow = beam.LargerRow
	}
	if g.ShearMethod == 0 {
		g.ShearMethod = beam.SimplifiedShear
	}
	if r.shear.rowsByStirrups {
		words := map[beam.ShearRow]string{
			beam.LargerRow: "the larger of rows (a) and (b)", beam.RowA: "row (a)", beam.RowB: "row (b)",
		}
		r.assume("reading.shear-row", "with at least the least stirrups Vc is by "+words[g.ShearRow]+" of Table 22.5.5.1; without them by row (c)", shearChecks...)
	} else {
		words := map[beam.ShearMethod]string{
			beam.SimplifiedShear: "the simplified expression of 22.5.5.1",
			beam.DetailedShear:   "the detailed expressions of Table 22.5.5.1; under an axial force by the simplified ones of 22.5.6.1 and 22.5.7.1",
		}
		r.assume("reading.shear-method", "Vc is by "+words[g.ShearMethod], shearChecks...)
	}
	corner := "a corner bar sits on the stirrup's leg at the bend's tangent point"
	if g.TuckedCorner {
		corner = "a corner bar is pushed into the stirrup's bend"
	}
	r.assume("reading.corner", corner, "spacing.clear", "flexure.positive", "flexure.negative")
	if g.CountSideBars {
		r.assume("reading.side-bars", "bars along the side faces count in bending, by the strains they have (9.7.2.3), where no torque needs them", flexureChecks...)
	}
}

// method lists what the expressions rest on, to be held against the finished
// beam.
func (r *resolution) method() {
	r.later(assumeTensionControl, "sections are tension-controlled, φ = "+number(r.reduction.tension), flexureChecks...)
	if r.shear.rowsByStirrups {
		r.later(assumeLeastStirrups, "where stirrups stand they are at least those of "+r.stirrups.leastClause+", so that Vc is by row (a) or (b)", shearChecks...)
	}
}
