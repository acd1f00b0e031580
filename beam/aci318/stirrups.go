package aci318

import (
	"math"

	"soffit.example/units"
)

// stirrupRules are the coefficients of least stirrups (9.6.3), of their
// greatest spacing (9.7.6.2.2), of bent bars (22.5.10.6 or 22.5.8.6) and of
// anchorage (25.7.1.3), in the units of an edition.
type stirrupRules struct {
	// Stirrups are required where Vu exceeds share φVc (9.6.3.1 of 318-14), or
	// φ lambdaRoot λ√f'c bw d (9.6.3.1 of 318-19); the other is zero.
	share      float64
	lambdaRoot float64
	shallow    float64 // h up to which only Vu > φVc requires them, Table 9.6.3.1
	medium     float64 // h up to which slabs and fibres have the same effect
	// Fibres have it up to this f'c, and up to φ fibreShear √f'c bw d.
	fibreStrength, fibreShear float64

	root  float64 // of √f'c bw/fyt, Table 9.6.3.3 or 9.6.3.4
	floor float64 // of bw/fyt

	heavy     float64 // of √f'c bw d: required Vs above which spacings are halved
	most      float64 // greatest spacing, Table 9.7.6.2.2
	mostHeavy float64
	across    bool // the table limits the distance between legs too

	bentMost float64 // of √f'c bw d: the most that one group of bent bars carries

	embedment float64 // of db fyt/(λ√f'c), 25.7.1.3(b)
	hookYield float64 // up to which a hook alone develops larger stirrups, 25.7.1.3(a)

	// Clauses that the editions number differently.
	strengthClause, inclinedClause, slopeClause         string // Av fyt d/s; with sin + cos; at least 45 degrees
	bentSlopeClause, bentSingleClause, bentSeriesClause string
	requiredClause, sumClause, leastClause              string
}

var (
	stirrups14US = stirrupRules{
		share: 0.5, shallow: 10, medium: 24, fibreStrength: 6000, fibreShear: 2, root: 0.75, floor: 50, bentMost: 3,
		heavy: 4, most: 24, mostHeavy: 12, embedment: 0.014, hookYield: 40000,
		strengthClause: "22.5.10.5.3", inclinedClause: "22.5.10.5.4", slopeClause: "22.5.10.5.2",
		bentSlopeClause: "22.5.10.6.1", bentSingleClause: "22.5.10.6.2", bentSeriesClause: "22.5.10.6.3",
		requiredClause: "22.5.10.1", sumClause: "22.5.10.4", leastClause: "9.6.3.3",
	}
	stirrups14SI = stirrupRules{
		share: 0.5, shallow: 250, medium: 600, fibreStrength: 40, fibreShear: 0.17, root: 0.062, floor: 0.35, bentMost: 0.25,
		heavy: 0.33, most: 600, mostHeavy: 300, embedment: 0.17, hookYield: 280,
		strengthClause: "22.5.10.5.3", inclinedClause: "22.5.10.5.4", slopeClause: "22.5.10.5.2",
		bentSlopeClause: "22.5.10.6.1", bentSingleClause: "22.5.10.6.2", bentSeriesClause: "22.5.10.6.3",
		requiredClause: "22.5.10.1", sumClause: "22.5.10.4", leastClause: "9.6.3.3",
	}
	stirrups19US = stirrupRules{
		lambdaRoot: 1, shallow: 10, medium: 24, fibreStrength: 6000, fibreShear: 2, root: 0.75, floor: 50, bentMost: 3,
		heavy: 4, most: 24, mostHeavy: 12, across: true, embedment: 0.014, hookYield: 40000,
		strengthClause: "22.5.8.5.3", inclinedClause: "22.5.8.5.4", slopeClause: "22.5.8.5.2",
		bentSlopeClause: "22.5.8.6.1", bentSingleClause: "22.5.8.6.2", bentSeriesClause: "22.5.8.6.3",
		requiredClause: "22.5.8.1", sumClause: "22.5.8.4", leastClause: "9.6.3.4",
	}
	stirrups19SI = stirrupRules{
		lambdaRoot: 0.083, shallow: 250, medium: 600, fibreStrength: 40, fibreShear: 0.17, root: 0.062, floor: 0.35, bentMost: 0.25,
		heavy: 0.33, most: 600, mostHeavy: 300, across: true, embedment: 0.17, hookYield: 280,
		strengthClause: "22.5.8.5.3", inclinedClause: "22.5.8.5.4", slopeClause: "22.5.8.5.2",
		bentSlopeClause: "22.5.8.6.1", bentSingleClause: "22.5.8.6.2", bentSeriesClause: "22.5.8.6.3",
		requiredClause: "22.5.8.1", sumClause: "22.5.8.4", leastClause: "9.6.3.4",
	}
)

// Shares of d in Table 9.7.6.2.2: of the spacing along the beam where the
// required Vs is small and where it is heavy; across it they are doubled.
const (
	alongShare  = 1.0 / 2
	heavyShare  = 1.0 / 4
	acrossShare = 2
)

// leastSlope is the flattest that stirrups may lie and count, in degrees from
// the axis of the beam.
const leastSlope = 45.0

// stirrupSteel is the shear reinforcement of a section; the zero value is
// none.
type stirrupSteel struct {
	area    units.Area // all legs of one stirrup
	spacing units.Length
	yield   units.Stress // as specified
	angle   float64      // of the legs with the axis, in degrees; zero: 90
}

// webSteel is a section with its stirrups, made ready for any forces. The
// concrete is prepared twice: as the stirrups provided let it count, and as
// without stirrups, which is what decides whether stirrups are required.
type webSteel struct {
	counted, bare webShear

	phi        float64
	slope      slope // of the legs
	fyt, av, s float64
	fytCapped  bool
	provided   float64 // Av/s
	byRoot     float64 // Av,min/s by the first expression of the table
	byFloor    float64
	least      float64 // Av,min/s, the greater
	wide       bool    // too far apart for any of it to count
	flat       bool    // leaning too far for any of it to count
	enough     bool    // at least Av,min/s, and neither wide nor flat
	steel      float64 // Vs of stirrups
	exempt     exemption
	mostAlong  float64 // greatest spacings while the required Vs is small
	heavyFrom  float64 // required Vs above which they are halved
	reserve    float64 // 8√f'c bw d of 22.5.1.2
	bentMost   float64 // 3√f'c bw d: the most that one group of bent bars carries
}

// slope is an angle with the axis of the beam as the expressions use it.
type slope struct {
	degrees  float64
	sin, cos float64
}

// slopeOf takes an angle in degrees; zero stands for upright.
func slopeOf(degrees float64) slope {
	if degrees == 0 || degrees == 90 {
		return slope{90, 1, 0}
	}
	sin, cos := math.Sincos(degrees * math.Pi / 180)
	return slope{degrees, sin, cos}
}

// upright reports stirrups at right angles to the axis.
func (s *slope) upright() bool { return s.degrees == 90 }

// lever is sin + cos, by which steel across the web carries shear.
func (s *slope) lever() float64 { return s.sin + s.cos }

// newWebSteel prepares a section. Stirrups count, for strength and as least
// reinforcement, only at a spacing that Table 9.7.6.2.2 allows: wider apart, a
// crack may run between them.
func (e *edition) newWebSteel(s *shearSection) webSteel {
	r := &e.stirrups
	w := webSteel{bare: e.newWebShear(s), phi: e.reduction.shear}
	w.counted = w.bare
	b := &w.bare
	yield, capped := e.shearYield(s.stirrups.yield)
	w.fyt, w.fytCapped = e.stressIn(yield), capped
	w.av, w.s = e.areaIn(s.stirrups.area), e.lengthIn(s.stirrups.spacing)
	w.mostAlong = min(alongShare*b.d, r.most)
	w.heavyFrom = r.heavy * b.root * b.web
	w.reserve = e.shear.section * b.root * b.web
	w.bentMost = r.bentMost * b.root * b.web
	w.exempt = b.exemption(e)
	w.slope = slopeOf(s.stirrups.angle)
	if w.fyt > 0 {
		w.byRoot, w.byFloor = r.root*b.root*b.bw/w.fyt, r.floor*b.bw/w.fyt
		w.least = math.Max(w.byRoot, w.byFloor)
	}
	if w.av > 0 && w.s > 0 {
		w.provided = w.av / w.s
		w.wide = !units.AtMost(w.s, w.mostAlong)
		w.flat = !units.AtMost(leastSlope, w.slope.degrees)
	}
	if w.provided > 0 && !w.wide && !w.flat {
		w.steel = w.av * w.fyt * w.slope.lever() * b.d / w.s
		w.enough = units.AtMost(w.least, w.provided)
	}
	if w.enough {
		w.counted.rootUsed = w.counted.root // the cap is lifted, 22.5.3.2
	}
	return w
}

// sectionShear is one section under one set of forces: strength, limit, and
// what is required of its stirrups. Forces are in the unit of the edition.
type sectionShear struct {
	shear    float64 // Vu
	moment   float64 // Mu, simultaneous
	concrete concreteShear
	bent     float64      // Vs of bent bars
	bentAt   units.Length // where they were sought
	nominal  float64      // Vc + Vs
	design   float64      // φVn
	limit    float64      // φ(Vc + 8√f'c bw d)

	bare     concreteShear // Vc without stirrups
	trigger  float64       // Vu above which 9.6.3.1 requires stirrups
	required bool          // by 9.6.3.1, or because φVc does not suffice
	needed   float64       // Vs = Vu/φ - Vc
	heavy    bool          // required Vs above 4√f'c bw d
	along    float64       // greatest spacing along the beam
	across   float64       // greatest distance between legs; zero: no such rule
}

// at judges nothing: it gives the section's values under forces.
func (w *webSteel) at(e *edition, f shearForces) sectionShear {
	r := &e.stirrups
	s := sectionShear{shear: math.Abs(e.forceIn(f.shear)), moment: math.Abs(e.momentIn(f.moment))}
	axial := e.forceIn(f.axial)
	s.concrete = w.counted.concrete(e, s.shear, s.moment, axial, w.enough)
	s.bent = f.bent.at(w)
	s.nominal = s.concrete.strength + w.steel + s.bent
	s.design = w.phi * s.nominal
	s.limit = w.phi * (s.concrete.strength + w.reserve)

	s.bare = s.concrete
	if w.enough {
		s.bare = w.bare.concrete(e, s.shear, s.moment, axial, false)
	}
	switch {
	case w.exempt == exemptFibres:
		s.trigger = w.phi * min(s.bare.strength, r.fibreShear*w.bare.root*w.bare.web)
	case w.exempt != 0:
		s.trigger = w.phi * s.bare.strength
	case r.lambdaRoot > 0:
		s.trigger = w.phi * r.lambdaRoot * w.bare.light.factor * w.bare.rootUsed * w.bare.web
	default:
		s.trigger = w.phi * r.share * s.bare.strength
	}
	s.needed = max(0, s.shear/w.phi-s.concrete.strength)
	s.required = !units.AtMost(s.shear, s.trigger) || !units.AtMost(s.shear, w.phi*s.concrete.strength)
	s.heavy = !units.AtMost(s.needed, w.heavyFrom)
	s.along = w.mostAlong
	d, most := w.bare.d, r.most
	share := alongShare
	if s.heavy {
		share, most = heavyShare, r.mostHeavy
		s.along = min(share*d, most)
	}
	if r.across {
		s.across = min(acrossShare*share*d, most)
	}
	return s
}

// mostInclined is the greatest spacing of stirrups that lean: every line at 45
// degrees from mid-depth to the tension steel, d/2 long along the beam, crosses
// one (9.7.6.2.3). Where Table 9.7.6.2.2 halves its spacings this is halved too.
func (w *webSteel) mostInclined(heavy bool) float64 {
	most := w.bare.d / 2 * (1 + w.slope.cos/w.slope.sin)
	if heavy {
		most /= 2
	}
	return most
}

// legSpacing is the distance across the beam between the centres of
// neighbouring legs, spread evenly between the outer ones.
func legSpacing(width, cover, diameter units.Length, legs int) units.Length {
	inside := width.Sub(cover.Scale(2)).Sub(diameter)
	if legs < 2 {
		return inside
	}
	return inside.Scale(1 / float64(legs-1))
}
