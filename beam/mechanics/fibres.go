package mechanics

import (
	"fmt"
	"math"
	"slices"

	"soffit.example/units"
)

// FibreUltimate is the equilibrium that fibre integration finds: the figures to
// hold against [Ultimate], with the same datums and signs.
type FibreUltimate struct {
	NeutralAxis units.Length
	Concrete    units.Force
	Nominal     units.Moment
	Equilibria  int
	Others      []units.Length
	Residual    units.Force
	Fibres      int // of concrete, at this equilibrium
}

// Fibres finds the equilibrium of the section under a law by fibre integration:
// concrete is cut into strips across the section, each strip carries three fibres
// at Gauss's points, each bar is a fibre, and the neutral axis is found by
// scanning and halving. Strips end where a part ends and where the law
// kinks, so that no strip straddles a break. Of the law it asks only the stress
// at a strain. It is a check on [Section.Ultimate], slower, and shares nothing
// with it but the law and the validation of input.
//
// Its errors are [*InputError] and [*NoEquilibriumError].
func (s Section) Fibres(law Law, bending Bending) (FibreUltimate, error) {
	if law.Ultimate() == 0 {
		return FibreUltimate{}, &InputError{Field: "law", Value: "the zero Law", Allowed: "a law with an ultimate strain"}
	}
	if err := s.Validate(); err != nil {
		return FibreUltimate{}, err
	}
	if bending.Sense > Hogging || bending.Displaced > Ignore {
		return FibreUltimate{}, &InputError{Field: "bending", Value: fmt.Sprintf("%+v", bending), Allowed: "a known sense and a known rule for displaced concrete"}
	}
	if !(math.Abs(bending.Axial.In(units.Newton)) <= 1e15) {
		return FibreUltimate{}, &InputError{Field: "axial", Value: bending.Axial.String(), Allowed: "from -1e12 to 1e12 kN"}
	}
	m := newFibreModel(s, law, bending)
	depths := m.equilibria()
	if len(depths) == 0 {
		// Hardly any compression, and hardly any curvature.
		least := m.sum(1e-12*m.height).force + m.axial
		most := m.sum(1e9*m.height).force + m.axial
		return FibreUltimate{}, &NoEquilibriumError{
			Sense: bending.Sense, Axial: bending.Axial,
			Least: units.Newton.Of(least), Most: units.Newton.Of(most),
		}
	}
	at := m.sum(depths[0])
	u := FibreUltimate{
		NeutralAxis: units.Metre.Of(depths[0]),
		Concrete:    units.Newton.Of(at.concrete),
		Nominal:     units.NewtonMetre.Of(at.moment),
		Equilibria:  len(depths),
		Residual:    units.Newton.Of(at.force),
		Fibres:      at.fibres,
	}
	for _, c := range depths[1:] {
		u.Others = append(u.Others, units.Metre.Of(c))
	}
	return u, nil
}

// stripsOverDepth is the number of strips over the stressed depth of a
// section, shared among the pieces into which parts and kinks divide it.
const stripsOverDepth = 12

// A fibreModel is a section in m, N and Pa, measured from the compression face.
type fibreModel struct {
	law    Law
	kinks  []float64 // strains, from the greatest down
	height float64
	axial  float64
	deduct bool
	middle float64 // centroid of the concrete
	slabs  []fibreSlab
	bars   []fibreBar
}

type fibreSlab struct{ top, bottom, topWidth, bottomWidth float64 }

type fibreBar struct{ depth, area, modulus, yield float64 }

// fibreSum is what the fibres add up to at one depth of the neutral axis.
type fibreSum struct {
	force    float64 // compression less tension less axial force
	concrete float64
	moment   float64 // about the centroid of the concrete
	fibres   int
}

func newFibreModel(s Section, law Law, bending Bending) *fibreModel {
	m := &fibreModel{
		law:    law,
		kinks:  law.Kinks(),
		height: s.Depth().In(units.Metre),
		axial:  bending.Axial.In(units.Newton),
		deduct: bending.Displaced == Deduct,
	}
	slices.Reverse(m.kinks)
	var area, moment, top float64
	for _, p := range s.Parts {
		bottom, width := p.Bottom.In(units.Metre), p.Width.In(units.Metre)
		below := width
		if !p.BottomWidth.IsZero() {
			below = p.BottomWidth.In(units.Metre)
		}
		m.slabs = append(m.slabs, fibreSlab{top, bottom, width, below})
		// Two triangles, a third of the height from either edge.
		height := bottom - top
		upper, lower := width*height/2, below*height/2
		area += upper + lower
		moment += upper*(top+height/3) + lower*(bottom-height/3)
		top = bottom
	}
	m.middle = moment / area
	for _, l := range s.Layers {
		m.bars = append(m.bars, fibreBar{
			depth: l.Depth.In(units.Metre), area: l.Area.In(units.SquareMetre),
			modulus: l.Steel.Modulus.In(units.Pascal), yield: l.Steel.Yield.In(units.Pascal),
		})
	}
	if bending.Sense == Hogging {
		m.middle = m.height - m.middle
		for i, p := range m.slabs {
			m.slabs[i] = fibreSlab{m.height - p.bottom, m.height - p.top, p.bottomWidth, p.topWidth}
		}
		for i := range m.bars {
			m.bars[i].depth = m.height - m.bars[i].depth
		}
	}
	for i := range m.bars {
		if m.bars[i].depth < 1e-9*m.height {
			m.bars[i].depth = 0 // on the compression face itself
		}
	}
	return m
}

// sum adds up all fibres with the neutral axis at depth c.
func (m *fibreModel) sum(c float64) fibreSum {
	t := fibreSum{force: -m.axial}
	for _, p := range m.slabs {
		top := p.top
		for _, kink := range m.kinks {
			if level := c * (1 - kink/m.law.ultimate); level > top {
				m.addStrips(&t, c, top, math.Min(level, p.bottom), p)
				top = level
			}
			if top >= p.bottom {
				break
			}
		}
	}
	t.force += t.concrete
	for _, b := range m.bars {
		strain := m.law.ultimate * (1 - b.depth/c)
		stress := b.modulus * strain
		if stress > b.yield {
			stress = b.yield
		} else if stress < -b.yield {
			stress = -b.yield
		}
		if m.deduct {
			stress -= m.law.Stress(strain).In(units.Pascal)
		}
		t.force += b.area * stress
		t.moment += b.area * stress * (m.middle - b.depth)
	}
	return t
}

// addStrips cuts the concrete of a slab between two levels into strips and adds
// their fibres to t.
func (m *fibreModel) addStrips(t *fibreSum, c, top, bottom float64, p fibreSlab) {
	taper := (p.bottomWidth - p.topWidth) / (p.bottom - p.top)
	n := 1 + math.Floor(stripsOverDepth*(bottom-top)/math.Min(c, m.height))
	strip := (bottom - top) / n
	offset := strip / 2 * math.Sqrt(0.6)
	shares := [3]float64{5.0 / 18, 8.0 / 18, 5.0 / 18} // of the strip
	for i := range int(n) {
		mid := top + strip*(float64(i)+0.5)
		for j, depth := range [3]float64{mid - offset, mid, mid + offset} {
			width := p.topWidth + taper*(depth-p.top)
			f := strip * shares[j] * width * m.law.Stress(m.law.ultimate*(1-depth/c)).In(units.Pascal)
			t.concrete += f
			t.moment += f * (m.middle - depth)
			t.fibres++
		}
	}
}

// equilibria returns every depth of the neutral axis at which the fibres
// balance, the least first. Between the depths at which a bar meets a kink of
// the law or yields, or an edge meets a kink, the force is smooth: each such
// stretch is scanned in panels, and a change of sign is halved down to a depth.
func (m *fibreModel) equilibria() []float64 {
	const panels = 4
	borders := m.borders()
	var found []float64
	add := func(c float64) {
		if n := len(found); n == 0 || c-found[n-1] > 1e-9*c {
			found = append(found, c)
		}
	}
	// The end of the stretch before.
	lastForce, lastDepth := math.NaN(), 0.0
	stretch := func(depth func(t float64) float64) {
		c0 := depth(0)
		f0 := m.sum(c0).force
		if lastForce < 0 && f0 > 0 {
			add(lastDepth) // balanced at the border itself
		}
		for i := range panels {
			t0, t1 := float64(i)/panels, float64(i+1)/panels
			c1 := depth(t1)
			f1 := m.sum(c1).force
			switch {
			case f0 == 0:
				add(c0)
			case f0 < 0 != (f1 < 0) && f1 != 0:
				add(m.halve(depth, t0, t1, f0 < 0))
			}
			c0, f0 = c1, f1
		}
		if f0 == 0 {
			add(c0)
		}
		lastForce, lastDepth = f0, c0
	}
	const inset = 1e-13
	from := 0.0
	for _, to := range borders {
		if to-from > 4*inset*to {
			a, b := math.Max(from*(1+inset), 1e-16*m.height), to*(1-inset)
			stretch(func(t float64) float64 { return a + (b-a)*t })
		}
		from = to
	}
	// Beyond the last border, scan the curvature down to nearly none.
	a := 1 / (from * (1 + inset))
	stretch(func(t float64) float64 { return 1 / (a * (1 - t*(1-1e-12))) })
	return found
}

// borders returns in order the depths of the neutral axis at which the smooth
// stretches of the force end.
func (m *fibreModel) borders() []float64 {
	var c []float64
	limit := m.law.ultimate
	levels := func(depth float64) {
		for _, kink := range m.kinks {
			c = append(c, depth/(1-kink/limit))
		}
	}
	for _, p := range m.slabs {
		levels(p.bottom)
	}
	for _, b := range m.bars {
		if b.depth <= 0 {
			continue
		}
		if m.deduct {
			levels(b.depth)
		}
		yield := b.yield / b.modulus
		c = append(c, b.depth/(1+yield/limit))
		if yield < limit {
			c = append(c, b.depth/(1-yield/limit))
		}
	}
	slices.Sort(c)
	return c
}

// halve narrows the depth at which the force changes sign between t0 and t1.
func (m *fibreModel) halve(depth func(t float64) float64, t0, t1 float64, rising bool) float64 {
	for range 200 {
		t := (t0 + t1) / 2
		if t <= t0 || t >= t1 {
			break
		}
		if c := depth(t); (m.sum(c).force < 0) == rising {
			t0 = t
		} else {
			t1 = t
		}
		if math.Abs(depth(t1)-depth(t0)) <= 1e-15*depth(t1) {
			break
		}
	}
	return depth((t0 + t1) / 2)
}
