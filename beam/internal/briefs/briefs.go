// Package briefs makes briefs at random for tests: of every edition, support,
// load and preference, with a share that no beam can satisfy, that lies outside
// the method, and that makes no sense at all. A brief depends on its seed and
// number alone.
package briefs

import (
	"math"
	"math/rand/v2"

	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// Kind is what a brief was made to be; the answer to it may differ.
type Kind uint8

const (
	Sound      Kind = iota + 1 // of ordinary proportions and loads
	NoCapacity                 // loads far beyond the section
	Outside                    // a scope rule is broken
	Absurd                     // a field holds what no beam has
)

func (k Kind) String() string { return [...]string{"", "sound", "hopeless", "outside", "absurd"}[k] }

// Sample is one brief for one code.
type Sample struct {
	Code  string // id of the edition
	Kind  Kind
	Brief beam.Brief
}

// Editions are the ids that samples are made for.
var Editions = [4]string{"ACI 318-19", "ACI 318M-19", "ACI 318-14", "ACI 318M-14"}

// Random makes brief number n of a seed.
func Random(seed, n uint64) Sample {
	m := newMaker(seed, n)
	s := Sample{Code: m.code, Kind: Sound}
	switch r := m.IntN(100); {
	case r < 8:
		s.Kind = NoCapacity
	case r < 18:
		s.Kind = Outside
	case r < 26:
		s.Kind = Absurd
	}
	m.fill(s.Kind == NoCapacity)
	m.keepSound()
	s.Brief = m.b
	switch s.Kind {
	case Outside:
		m.breakScope(&s.Brief)
	case Absurd:
		m.spoil(&s.Brief)
	}
	return s
}

// keepSound takes back what does not fit a small section: a hollow that leaves
// no wall, and a cover that leaves no room.
func (m *maker) keepSound() {
	section := m.b.Section
	if _, faults := beam.GeometryOf(&section); len(faults) > 0 {
		m.b.Section.Voids = nil
		section = m.b.Section
		if _, faults = beam.GeometryOf(&section); len(faults) > 0 {
			return
		}
	}
	if side := section.Width.Min(section.Depth); !m.b.Cover.Scale(2).Less(side) {
		m.b.Cover = side.Scale(0.1)
	}
}

// Small makes a sound brief whose preferences leave few arrangements, so that
// all of them can be gone through.
func Small(seed, n uint64) Sample { return small(seed, n, plain) }

// SmallFlanged makes such a brief for a tee or an inverted tee, most of them
// with tension in the flange.
func SmallFlanged(seed, n uint64) Sample { return small(seed, n, flanged) }

// SmallTwisted makes such a brief with a torque that must be designed for.
func SmallTwisted(seed, n uint64) Sample { return small(seed, n, twisted) }

func small(seed, n uint64, of smallness) Sample {
	m := newMaker(seed, n)
	m.small, m.of = true, of
	m.fill(m.IntN(20) == 0)
	return Sample{Code: m.code, Kind: Sound, Brief: m.b}
}

// smallness is what a small brief is for.
type smallness uint8

const (
	plain smallness = iota
	flanged
	twisted
)

// maker makes one brief.
type maker struct {
	*rand.Rand
	code  string
	si    bool
	y19   bool
	small bool
	of    smallness
	b     beam.Brief

	width, depth float64 // of the web, in inches or mm
	area         float64 // of the section, about
	fc, fy       float64 // in psi or MPa
	twist        float64 // greatest torque over the greatest that may be neglected; zero: none
	path         beam.TorquePath
}

func newMaker(seed, n uint64) *maker {
	m := &maker{Rand: rand.New(rand.NewPCG(seed, n))}
	k := m.IntN(4)
	m.code, m.si, m.y19 = Editions[k], k%2 == 1, k < 2
	return m
}

// chance is true in so many of a hundred.
func (m *maker) chance(percent int) bool { return m.IntN(100) < percent }

func (m *maker) between(a, b float64) float64 { return a + (b-a)*m.Float64() }

// step rounds to a multiple.
func step(v, by float64) float64 { return math.Round(v/by) * by }

func pick[T any](m *maker, of ...T) T { return of[m.IntN(len(of))] }

func (m *maker) length(v float64) units.Length {
	if m.si {
		return units.Millimetre.Of(v)
	}
	return units.Inch.Of(v)
}

func (m *maker) stress(v float64) units.Stress {
	if m.si {
		return units.Megapascal.Of(v)
	}
	return units.PSI.Of(v)
}

// either is the first value in inch-pound editions, the second in SI.
func (m *maker) either(us, si float64) float64 {
	if m.si {
		return si
	}
	return us
}

func (m *maker) fill(hopeless bool) {
	b := &m.b
	b.Reference = "R-" + string(rune('A'+m.IntN(26)))
	member := !m.chance(25)
	m.section(member)
	m.materials()
	m.torsion()
	load := m.between(0.05, 0.95)
	if m.small {
		load = m.between(0.05, 0.7)
	}
	if m.chance(15) {
		load = m.between(0.9, 1.6)
	}
	if m.twist > 1 {
		load *= m.between(0.3, 0.9)
	}
	if hopeless {
		load = m.between(2.5, 40)
	}
	// A moment of that share of what the section carries singly reinforced.
	moment := load * 0.19 * m.fc * m.width * math.Pow(0.88*m.depth, 2) * 0.9 // lb-in or N-mm
	if member {
		m.member(moment)
	} else {
		m.demands(moment)
	}
	m.surroundings()
	m.preferences()
	m.readings()
}

func (m *maker) materials() {
	c := &m.b.Concrete
	m.fc = m.either(step(m.between(2500, 7000), 500), step(m.between(20, 50), 5))
	if m.chance(12) {
		m.fc = m.either(step(m.between(7500, 14000), 500), step(m.between(55, 95), 5))
	}
	c.Strength = m.stress(m.fc)
	if m.chance(40) {
		c.Kind = beam.Normalweight
	}
	density := func(us, si float64) units.Density {
		if m.si {
			return units.KilogramPerCubicMetre.Of(si)
		}
		return units.PoundPerCubicFoot.Of(us)
	}
	if m.chance(30) {
		c.Density = density(step(m.between(142, 155), 1), step(m.between(2300, 2500), 10))
	}
	if m.chance(15) {
		m.lightweight(density)
	}
	if !m.small && m.chance(6) {
		c.Fibres = true
	}
	if m.chance(50) {
		c.Aggregate = m.length(m.either(pick(m, 0.375, 0.5, 0.75, 0.75, 1, 1.5), pick(m, 10.0, 14, 20, 20, 25, 40)))
	}
	r := &m.b.Reinforcement
	r.Catalog = "astm-inch"
	if m.si != m.chance(6) {
		r.Catalog = "astm-metric"
	}
	m.fy = m.either(60000, 420)
	if m.chance(30) {
		m.fy = pick(m, m.either(40000, 280), m.either(80000, 550), m.either(75000, 520))
		if m.y19 && m.chance(30) {
			m.fy = m.either(100000, 690)
		}
	}
	r.Yield = m.stress(m.fy)
	if m.chance(50) {
		r.StirrupYield = m.stress(pick(m, m.either(60000, 420), m.either(60000, 420), m.either(40000, 280), m.either(80000, 550)))
	}
	if m.chance(40) {
		r.Coating = pick(m, beam.Uncoated, beam.Epoxy, beam.Galvanized)
	}
}

// lightweight draws a lightweight concrete by any of the ways to its λ.
func (m *maker) lightweight(density func(us, si float64) units.Density) {
	c := &m.b.Concrete
	c.Kind = pick(m, beam.SandLightweight, beam.AllLightweight)
	w := m.between(0, 1)
	if !m.y19 {
		w *= 0.8 // lightweight ends at 115 lb/ft3 in 318-14
	}
	c.Density = density(step(95+w*25, 1), step(1500+w*400, 10))
	if m.small {
		return
	}
	if m.chance(50) {
		c.Kind = pick(m, beam.FineBlend, beam.CoarseBlend)
		c.Normal = step(m.between(0, 1), 0.05)
	}
	if m.chance(30) {
		c.Splitting = m.stress(m.between(0.65, 1.1) * m.either(6.7, 0.56) * math.Sqrt(m.fc))
	}
}

// torsion decides how large the torques are.
func (m *maker) torsion() {
	if m.small {
		if m.of == twisted {
			m.twist = m.between(1.1, 5)
			m.path = pick(m, beam.EquilibriumTorque, beam.CompatibilityTorque)
		}
		return
	}
	switch r := m.IntN(100); {
	case r < 42:
	case r < 55:
		m.twist = m.between(0.1, 0.95)
	case r < 80:
		m.twist = m.between(1, 4.5)
	default:
		m.twist = m.between(3, 8)
	}
	m.path = pick(m, 0, beam.EquilibriumTorque, beam.CompatibilityTorque, beam.CompatibilityTorque)
	if m.path == beam.CompatibilityTorque && m.chance(30) {
		m.twist *= m.between(1, 3)
	}
	if m.chance(20) {
		m.b.Readings.TorsionAngle = pick(m, 30.0, 36, 37.5, 45, 50, 60)
	}
}

func (m *maker) surroundings() {
	b := &m.b
	b.Exposure = pick(m, beam.Interior, beam.Interior, beam.Interior, beam.Weather, beam.Ground)
	if m.chance(12) {
		b.Cover = m.length(m.either(pick(m, 0.75, 1, 1.5, 1.75, 2, 2.5, 3), pick(m, 20.0, 30, 40, 45, 50, 60, 75)))
		if m.chance(30) {
			b.Exposure = 0
		}
	}
	if m.chance(30) {
		b.Braced = m.length(m.width * m.between(5, 52))
	}
	if m.chance(60) {
		b.Serviceability.Attached = pick(m, beam.NothingAttached, beam.Robust, beam.Fragile)
	}
	b.Serviceability.Months = pick(m, 0, 3, 12, 60)
}

func (m *maker) readings() {
	r := &m.b.Readings
	r.IgnoreDisplaced, r.RoundedYield, r.TuckedCorner = m.chance(20), m.chance(20), m.chance(20)
	if !m.small {
		r.CountSideBars = m.chance(10)
	}
	if m.chance(30) {
		r.ShearRow = pick(m, beam.LargerRow, beam.RowA, beam.RowB)
	}
	if m.chance(30) {
		r.ShearMethod = pick(m, beam.SimplifiedShear, beam.DetailedShear)
	}
}

var (
	inchBars   = []string{"#4", "#5", "#6", "#7", "#8", "#9", "#10", "#11"}
	metricBars = []string{"No. 13", "No. 16", "No. 19", "No. 22", "No. 25", "No. 29", "No. 32", "No. 36"}
	inchTies   = []string{"#3", "#4", "#5", "#6"}
	metricTies = []string{"No. 10", "No. 13", "No. 16", "No. 19"}
)

// some takes a run of neighbours from a list.
func (m *maker) some(list []string, most int) []string {
	n := 1 + m.IntN(most)
	from := m.IntN(len(list) - n + 1)
	return append([]string(nil), list[from:from+n]...)
}

func (m *maker) preferences() {
	p := &m.b.Preferences
	p.NoCures = true
	bars, ties := inchBars, inchTies
	if m.b.Reinforcement.Catalog == "astm-metric" {
		bars, ties = metricBars, metricTies
	}
	if m.small {
		p.Bars = m.some(bars[1:], 3)
		p.Stirrups = m.some(ties[:3], 2)
		p.MaxLayers = 1 + m.IntN(2)
		p.MaxLegs = pick(m, 2, 3, 4)
		p.MaxZones = pick(m, 1, 3)
		p.Mixed = m.chance(25)
		if m.of != plain {
			p.Bars, p.MaxLayers, p.Mixed = p.Bars[:min(2, len(p.Bars))], 1, false
			p.Stirrups = p.Stirrups[:1]
			if m.of == twisted {
				p.MaxLegs, p.MaxZones = pick(m, 2, 3), 1
			}
		}
		p.SpacingBy = m.length(m.either(pick(m, 1.0, 1.5, 2), pick(m, 25.0, 40, 50)))
		p.Prefer, p.KeepBest = beam.LeastSteel, -1
		return
	}
	p.Bars = m.some(bars, 4)
	if m.chance(10) {
		p.Bars = nil
	}
	p.Stirrups = m.some(ties, 2)
	if m.chance(30) {
		p.Stirrups = nil
	}
	p.MaxLayers = pick(m, 0, 1, 2, 3)
	p.MaxLegs = pick(m, 0, 2, 3, 4, 5)
	p.MaxZones = pick(m, 0, 1, 3)
	p.Mixed = m.chance(20)
	p.Prefer = pick(m, 0, beam.LeastSteel, beam.FewestBars, beam.OneSize, beam.Shallowest, beam.FewestMarks)
	p.KeepBest = pick(m, 0, -1, 1, 3)
	if m.b.Section.Flange() != 0 || m.twist > 1 { // bars in the flange, and any at the other face, multiply what there is to try
		p.Bars = m.some(bars, 2)
		p.MaxLayers, p.MaxLegs = min(p.MaxLayers, 2), pick(m, 2, 3)
	}
	if m.chance(12) {
		p.Bundles = pick(m, 2, 3, 4)
	}
	if m.chance(15) && m.b.Section.Shape != beam.Polygon {
		p.Depths = []units.Length{m.length(m.depth + m.either(4, 100)), m.length(m.depth + m.either(2, 50))}
	}
	if m.chance(20) {
		p.SpacingBy = m.length(m.either(pick(m, 0.25, 1, 2), pick(m, 5.0, 25, 50)))
	}
}

// demands gives factored forces in place of spans.
func (m *maker) demands(moment float64) {
	shear := moment / (m.depth * m.between(2, 9))
	for i := range 1 + m.IntN(4) {
		share := m.between(0.3, 1)
		if i == 0 {
			share = 1
		}
		if m.chance(30) {
			share = -share * 0.6
		}
		d := beam.Demand{Name: string(rune('a' + i)), Moment: m.momentOf(share * moment), Shear: m.forceOf(shear * m.between(-1, 1))}
		switch {
		case m.chance(8):
			d.Moment = units.Moment{}
		case m.chance(12):
			d.Axial = m.forceOf(0.05 * m.between(-0.6, 1.5) * m.fc * m.area)
		}
		if m.twist > 0 && (i == 0 || m.chance(60)) {
			d.Path, d.Torque = m.path, m.momentOf(m.torque()*m.twist*m.between(0.3, 1)*pick(m, 1.0, -1))
			if m.chance(15) {
				d.Path = pick(m, beam.EquilibriumTorque, beam.CompatibilityTorque)
			}
		}
		m.b.Demands = append(m.b.Demands, d)
	}
}

func (m *maker) momentOf(v float64) units.Moment {
	if m.si {
		return units.NewtonMillimetre.Of(v)
	}
	return units.PoundInch.Of(v)
}

func (m *maker) forceOf(v float64) units.Force {
	if m.si {
		return units.Newton.Of(v)
	}
	return units.PoundForce.Of(v)
}

// intensityOf takes lb/in or N/mm.
func (m *maker) intensityOf(v float64) units.LineLoad {
	if m.si {
		return units.KilonewtonPerMetre.Of(v)
	}
	return units.PoundPerFoot.Of(12 * v)
}

// member gives a span with supports and loads whose factored moment is about
// the given one.
func (m *maker) member(moment float64) {
	b := &m.b
	kinds := [2]statics.SupportKind{statics.Pinned, statics.Roller}
	slender := m.between(8.5, 17)
	share := 8.0 // w l2 over the moment
	switch r := m.IntN(100); {
	case r < 50:
	case r < 60:
		kinds, slender, share = [2]statics.SupportKind{statics.Fixed, statics.Fixed}, m.between(8.5, 22), 12
	case r < 72:
		kinds, slender = [2]statics.SupportKind{statics.Fixed, statics.Pinned}, m.between(8.5, 19)
		if m.chance(50) {
			kinds[0], kinds[1] = kinds[1], kinds[0]
		}
	case r < 90:
		kinds, slender, share = [2]statics.SupportKind{statics.Fixed, statics.Free}, m.between(3, 8.5), 2
		if m.chance(50) {
			kinds[0], kinds[1] = kinds[1], kinds[0]
		}
	default:
		kinds = [2]statics.SupportKind{statics.Roller, statics.Roller}
	}
	if m.small {
		slender *= 0.85
	}
	if m.of == flanged && m.b.Section.Shape == beam.Tee && share == 8 {
		// The flange is to be in tension.
		kinds, slender, share = [2]statics.SupportKind{statics.Fixed, statics.Free}, m.between(3, 7), 2
	}
	span := step(slender*m.depth, m.either(6, 100))
	b.Spans = []units.Length{m.length(span)}
	b.Supports = make([]beam.Support, 2)
	for i := range b.Supports {
		s := &b.Supports[i]
		s.Kind = kinds[i]
		if s.Kind != statics.Free && m.chance(75) {
			s.Width = m.length(min(m.either(step(m.between(6, 18), 1), step(m.between(150, 450), 10)), span/3))
		}
		s.Hung = s.Kind != statics.Free && m.chance(4)
	}
	total := moment * share / (span * span) / 1.4 // lb/in or N/mm, of service loads
	own := m.either(150.0/1728, 2450*9.80665e-9) * m.area
	if m.chance(8) {
		b.NoSelfWeight = true
	} else {
		total = math.Max(total-own, 0)
	}
	m.loads(total, span)
	m.twists(span)
}

// twists adds the torques, whose greatest factored sum is about the one drawn.
func (m *maker) twists(span float64) {
	if m.twist == 0 {
		return
	}
	b := &m.b
	held := 2.0 // ends that hold
	for _, s := range b.Supports {
		if s.Kind == statics.Free {
			held = 1
		}
	}
	n := 1 + m.IntN(2)
	for i := range n {
		l := beam.Load{
			Case: pick(m, beam.Dead, beam.Live, beam.Live, beam.Snow), Shape: beam.UniformTorque, Path: m.path,
			Moment: m.momentOf(m.torque() * m.twist / 1.4 / float64(n) * held),
		}
		if m.chance(10) {
			l.Path = pick(m, beam.EquilibriumTorque, beam.CompatibilityTorque)
		}
		if m.chance(45) {
			at := m.between(0, 1)
			l.Shape = beam.Torque
			l.At = m.length(step(at*span, m.either(1, 10)))
			if held == 2 {
				l.Moment = l.Moment.Scale(0.5 / max(at, 1-at))
			}
		}
		if m.chance(25) || i > 0 && m.chance(50) {
			l.Moment = l.Moment.Neg()
		}
		b.Loads = append(b.Loads, l)
	}
}

func (m *maker) loads(total, span float64) {
	b := &m.b
	uniform := func(c beam.LoadCase, w float64) {
		b.Loads = append(b.Loads, beam.Load{Case: c, Shape: beam.Uniform, Intensity: m.intensityOf(w)})
	}
	dead := m.between(0.2, 0.7)
	rest := total * (1 - dead)
	if dead*total > 0 {
		uniform(beam.Dead, dead*total)
	}
	at := func() float64 { return step(m.between(0, 1)*span, m.either(1, 10)) }
	for range 1 + m.IntN(3) {
		c := pick(m, beam.Live, beam.Live, beam.Live, beam.RoofLive, beam.Snow, beam.Rain, beam.Dead, beam.Wind, beam.Earthquake)
		w := rest * m.between(0.3, 0.8)
		if c == beam.Wind && m.chance(60) {
			w *= -m.between(0.5, 4) // uplift
		}
		l := beam.Load{Case: c, Sustained: m.Float64()}
		switch r := m.IntN(100); {
		case r < 45:
			uniform(c, w)
			continue
		case r < 65:
			l.Shape = beam.Partial
			x, y := at(), at()
			if x == y {
				x, y = 0, span
			}
			l.From, l.To = m.length(min(x, y)), m.length(max(x, y))
			l.Intensity = m.intensityOf(w)
			if l.Varies = m.chance(50); l.Varies {
				l.IntensityEnd = m.intensityOf(w * m.between(-0.2, 2))
			}
		case r < 88:
			// A point load is kept off the supports, where it would make a
			// deep beam.
			l.Shape = beam.PointLoad
			l.Force = m.forceOf(w * span * m.between(0.2, 0.6))
			x := at()
			for try := 0; try < 20 && m.nearSupport(x, span); try++ {
				x = at()
			}
			if m.nearSupport(x, span) {
				continue
			}
			l.At = m.length(x)
		default:
			l.Shape = beam.Couple
			l.Moment = m.momentOf(w * span * span * m.between(-0.1, 0.1))
			l.At = m.length(at())
		}
		l.Hung = m.chance(4)
		b.Loads = append(b.Loads, l)
	}
}

// nearSupport reports a place within about twice the depth of a support.
func (m *maker) nearSupport(x, span float64) bool {
	reach := 2*m.depth + m.either(10, 250)
	left := m.b.Supports[0].Kind != statics.Free && x < reach
	right := m.b.Supports[1].Kind != statics.Free && x > span-reach
	return left || right
}
