package mechanics

import (
	"math"

	"soffit.example/units"
)

// Properties are the elastic properties of an uncracked section.
type Properties struct {
	Area         units.Area
	Centroid     units.Length // from the top face
	SecondMoment units.SecondMoment
	ToTop        units.Length // from the centroid to the top face
	ToBottom     units.Length // and to the bottom face
}

// Gross returns the properties of the concrete alone, steel left out.
func (s Section) Gross() (Properties, error) {
	s.Layers = nil
	return s.Uncracked(1)
}

// Uncracked returns the properties of the transformed section: all concrete, and
// for each bar modularRatio - 1 times its area, since the concrete it displaces
// is counted already. modularRatio, the modulus of steel over that of concrete,
// is from 1 to 1000.
func (s Section) Uncracked(modularRatio float64) (Properties, error) {
	if err := s.checkElastic(modularRatio); err != nil {
		return Properties{}, err
	}
	var area, first float64
	for i := range s.Parts {
		p := s.trapezoid(i)
		area += p.area()
		first += p.first(0)
	}
	for i := range s.Layers {
		depth, a := s.layer(i)
		area += (modularRatio - 1) * a
		first += (modularRatio - 1) * a * depth
	}
	centroid := first / area
	var second float64
	for i := range s.Parts {
		p := s.trapezoid(i)
		second += p.second(centroid)
	}
	for i := range s.Layers {
		depth, a := s.layer(i)
		second += (modularRatio - 1) * a * (depth - centroid) * (depth - centroid)
	}
	depth := s.Depth()
	c := units.Metre.Of(centroid)
	return Properties{
		Area:         units.SquareMetre.Of(area),
		Centroid:     c,
		SecondMoment: units.Metre4.Of(second),
		ToTop:        c,
		ToBottom:     depth.Sub(c),
	}, nil
}

// Cracked is a cracked transformed section: concrete carries no tension, and
// stresses are in proportion to strains.
type Cracked struct {
	NeutralAxis  units.Length // from the compression face
	SecondMoment units.SecondMoment
	ModularRatio float64

	sense Sense
	depth units.Length
}

// Cracked returns the cracked transformed section in the given sense of bending
// without axial force. A bar in tension counts modularRatio times its area and a
// bar in compression modularRatio - 1 times, since the concrete it displaces is
// counted already. modularRatio is from 1 to 1000.
//
// Its errors are [*InputError], also where no layer of steel can take tension.
func (s Section) Cracked(modularRatio float64, sense Sense) (Cracked, error) {
	if err := s.checkElastic(modularRatio); err != nil {
		return Cracked{}, err
	}
	if sense > Hogging {
		return Cracked{}, &InputError{Field: "sense", Value: sense.String(), Allowed: "Sagging or Hogging"}
	}
	m := crackedModel{section: s, ratio: modularRatio, hogging: sense == Hogging, height: s.Depth().In(units.Metre)}
	x, ok := m.neutralAxis()
	if !ok {
		return Cracked{}, &InputError{Field: "layers", Value: "none away from the compression face", Allowed: "at least one layer in tension"}
	}
	return Cracked{
		NeutralAxis:  units.Metre.Of(x),
		SecondMoment: units.Metre4.Of(m.second(x)),
		ModularRatio: modularRatio,
		sense:        sense,
		depth:        s.Depth(),
	}, nil
}

// ConcreteStress returns the stress at the compression face under a moment,
// compression positive.
func (c Cracked) ConcreteStress(moment units.Moment) units.Stress {
	return c.stress(moment, c.NeutralAxis)
}

// SteelStress returns the stress of steel at a depth from the top face under a
// moment, tension positive.
func (c Cracked) SteelStress(moment units.Moment, depth units.Length) units.Stress {
	if c.sense == Hogging {
		depth = c.depth.Sub(depth)
	}
	return c.stress(moment, depth.Sub(c.NeutralAxis)).Scale(c.ModularRatio)
}

// stress returns the stress at a distance from the neutral axis: moment times
// distance over the second moment.
func (c Cracked) stress(moment units.Moment, distance units.Length) units.Stress {
	return units.Pascal.Of(moment.In(units.NewtonMetre) * distance.In(units.Metre) / c.SecondMoment.In(units.Metre4))
}

// A crackedModel measures a section in m from its compression face.
type crackedModel struct {
	section Section
	ratio   float64
	hogging bool
	height  float64
}

func (m *crackedModel) trapezoid(i int) trapezoid {
	p := m.section.trapezoid(i)
	if m.hogging {
		p = trapezoid{m.height - p.bottom, m.height - p.top, p.below, p.above}
	}
	return p
}

func (m *crackedModel) layer(i int) (depth, area float64) {
	depth, area = m.section.layer(i)
	if m.hogging {
		depth = max(0, m.height-depth)
	}
	return depth, area
}

// first returns the first moment about x of all that acts: it rises with x
// throughout, and is zero at the neutral axis.
func (m *crackedModel) first(x float64) float64 {
	var q float64
	for i := range m.section.Parts {
		if p := m.trapezoid(i); p.top < x {
			p = p.downTo(x)
			q -= p.first(x)
		}
	}
	for i := range m.section.Layers {
		depth, area := m.layer(i)
		q += m.weight(depth, x) * area * (x - depth)
	}
	return q
}

// weight returns how often the area of a bar counts.
func (m *crackedModel) weight(depth, x float64) float64 {
	if depth < x {
		return m.ratio - 1
	}
	return m.ratio
}

// neutralAxis brackets the depth between two neighbouring levels of parts and
// bars, where the first moment is a quadratic in x, a cubic if the part tapers,
// and solves that.
func (m *crackedModel) neutralAxis() (x float64, ok bool) {
	if !(m.first(0) < 0) {
		return 0, false
	}
	lo, hi := 0.0, m.height
	narrow := func(level float64) {
		if level <= lo || level >= hi {
			return
		}
		if m.first(level) < 0 {
			lo = level
		} else {
			hi = level
		}
	}
	for i := range m.section.Parts {
		narrow(m.trapezoid(i).bottom)
	}
	for i := range m.section.Layers {
		depth, _ := m.layer(i)
		narrow(depth)
	}
	// slope/6·t³ + width/2·t² + area·t + first(lo) = 0, t from lo on.
	var slope, width, area float64
	mid := lo + (hi-lo)/2
	for i := range m.section.Parts {
		p := m.trapezoid(i)
		switch {
		case p.bottom <= mid:
			area += p.area()
		case p.top < mid:
			slope = p.slope()
			p = p.downTo(lo)
			width = p.below
			area += p.area()
		}
	}
	for i := range m.section.Layers {
		depth, a := m.layer(i)
		area += m.weight(depth, mid) * a
	}
	constant := m.first(lo)
	if slope == 0 {
		t := -2 * constant / (area + math.Sqrt(area*area-2*width*constant))
		return lo + min(t, hi-lo), true
	}
	// The first moment is convex, since widths are positive: from the far end
	// Newton's steps come down to the root and never pass it.
	t := hi - lo
	for range 100 {
		step := (constant + t*(area+t*(width/2+t*slope/6))) / (area + t*(width+t*slope/2))
		if !(step > 0) {
			break
		}
		t -= step
	}
	return lo + max(0, t), true
}

// second returns the second moment about x of all that acts.
func (m *crackedModel) second(x float64) float64 {
	var second float64
	for i := range m.section.Parts {
		if p := m.trapezoid(i); p.top < x {
			p = p.downTo(x)
			second += p.second(x)
		}
	}
	for i := range m.section.Layers {
		depth, area := m.layer(i)
		second += m.weight(depth, x) * area * (x - depth) * (x - depth)
	}
	return second
}

func (s Section) checkElastic(modularRatio float64) error {
	if err := s.Validate(); err != nil {
		return err
	}
	return checkNumber("modular ratio", modularRatio, 1, 1000)
}

// trapezoid returns part i in m from the top face. It ends where the next
// begins, whatever the last bits of their faces say.
func (s Section) trapezoid(i int) trapezoid {
	p := trapezoid{bottom: s.Parts[i].Bottom.In(units.Metre)}
	if i > 0 {
		p.top = s.Parts[i-1].Bottom.In(units.Metre)
	}
	p.above, p.below = s.Parts[i].widths()
	return p
}

// layer returns layer i in m from the top face and m².
func (s Section) layer(i int) (depth, area float64) {
	return s.Layers[i].Depth.In(units.Metre), s.Layers[i].Area.In(units.SquareMetre)
}

// A trapezoid is a part of a section: levels of its edges and widths there.
type trapezoid struct{ top, bottom, above, below float64 }

func (p *trapezoid) area() float64 { return (p.above + p.below) / 2 * (p.bottom - p.top) }

// slope returns how fast the width grows downwards.
func (p *trapezoid) slope() float64 { return (p.below - p.above) / (p.bottom - p.top) }

// first returns the first moment of area about the level x, positive below it.
func (p *trapezoid) first(x float64) float64 {
	u, v := p.top-x, p.bottom-x
	return (v - u) / 6 * (p.above*(2*u+v) + p.below*(u+2*v))
}

// second returns the second moment of area about the level x.
func (p *trapezoid) second(x float64) float64 {
	u, v := p.top-x, p.bottom-x
	return (v - u) / 12 * (p.above*(3*u*u+2*u*v+v*v) + p.below*(u*u+2*u*v+3*v*v))
}

// downTo returns what of p is above the level x, which is below its top.
func (p trapezoid) downTo(x float64) trapezoid {
	if x < p.bottom {
		p.below = p.above + p.slope()*(x-p.top)
		p.bottom = x
	}
	return p
}
