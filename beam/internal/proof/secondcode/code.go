package secondcode

import (
	"fmt"
	"math"

	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/units"
)

// Code is the made-up code. Its zero value is ready.
type Code struct{}

var _ beam.Code = Code{}

// ID of the one edition.
const ID = "Made-up 1"

// The rules, in N and mm.
const (
	concreteFactor = 1.5 // on strength
	steelFactor    = 1.15
	blockIntensity = 0.95 // of the design strength
	blockFactor    = 0.78
	crushing       = 0.0032
	steelModulus   = 205e3
	axisMost       = 0.40   // of d
	leastRatio     = 0.0016 // of b d
	leastGap       = 22.0
	gapDiameters   = 1.2
	layerGap       = 28.0
	barPitchMost   = 220.0
	plainShear     = 0.11 // of √fc b d
	leverArm       = 0.9  // of d
	crushingShear  = 0.18 // of design strength times b and lever arm
	leastStirrups  = 0.08 // of √fc b / fy
	spacingMost    = 350.0
	spacingShare   = 0.6 // of d
	acrossMost     = 400.0
	slenderMost    = 22.0 // span over depth
	strongest      = 60.0
)

// Edition names the code.
func (Code) Edition() beam.Edition {
	return beam.Edition{
		ID: ID, Title: "A made-up code for tests", Year: 1, System: units.SI,
		Scope: []string{"axial force", "torque", "concrete above 60 MPa"},
	}
}

// Resolve fills what the brief left open.
func (Code) Resolve(b *beam.Brief, note *beam.Register) []beam.Fault {
	if b.Concrete.Kind == 0 {
		b.Concrete.Kind = beam.Normalweight
	}
	if b.Concrete.Density.IsZero() {
		b.Concrete.Density = units.KilogramPerCubicMetre.Of(2500)
		note.Assume(beam.Assumption{ID: "concrete.density", Assumed: "2500 kg/m3", UsedIn: []string{"self-weight"}, Open: true})
	}
	if b.Concrete.Aggregate.IsZero() {
		b.Concrete.Aggregate = units.Millimetre.Of(16)
	}
	if b.Reinforcement.StirrupYield.IsZero() {
		b.Reinforcement.StirrupYield = b.Reinforcement.Yield
	}
	if b.Exposure == 0 {
		b.Exposure = beam.Interior
	}
	if b.Concrete.Kind != beam.Normalweight {
		return []beam.Fault{{Path: "/concrete/kind", Detail: "only normalweight concrete is known", Allowed: "normalweight"}}
	}
	return nil
}

// Combinations are three, of which those of unloaded cases are dropped.
func (Code) Combinations(b *beam.Brief) (kept []beam.Combination, dropped []beam.DroppedCombination) {
	loaded := map[beam.LoadCase]bool{beam.Dead: !b.NoSelfWeight}
	for i := range b.Loads {
		loaded[b.Loads[i].Case] = true
	}
	add := func(id string, leading beam.LoadCase, factors ...beam.CaseFactor) {
		if loaded[leading] {
			kept = append(kept, beam.Combination{ID: id, Clause: "L1", Factors: factors})
			return
		}
		dropped = append(dropped, beam.DroppedCombination{ID: id, Clause: "L1", Reason: "no " + leading.String() + " load"})
	}
	add("1.35G", beam.Dead, beam.CaseFactor{Case: beam.Dead, Factor: 1.35})
	add("1.25G + 1.5Q", beam.Live, beam.CaseFactor{Case: beam.Dead, Factor: 1.25}, beam.CaseFactor{Case: beam.Live, Factor: 1.5})
	add("G - 1.5W", beam.Wind, beam.CaseFactor{Case: beam.Dead, Factor: 1}, beam.CaseFactor{Case: beam.Wind, Factor: -1.5})
	return kept, dropped
}

// Scope refuses torque, axial force and strong concrete.
func (Code) Scope(p *beam.Problem) []beam.Refusal {
	var out []beam.Refusal
	refuse := func(rule, detail string) {
		out = append(out, beam.Refusal{Rule: "scope." + rule, Clause: "S1", Detail: detail})
	}
	if p.Brief.Concrete.Strength.In(units.Megapascal) > strongest {
		refuse("concrete", "the concrete is above 60 MPa")
	}
	for _, d := range p.Forces.Demands() {
		if !d.Axial.IsZero() || !d.Torque.IsZero() {
			refuse("forces", d.Combination+" has axial force or torque")
		}
	}
	for i := range p.Brief.Loads {
		if l := &p.Brief.Loads[i]; l.Shape == beam.Torque || l.Shape == beam.UniformTorque {
			refuse("forces", fmt.Sprintf("load %d is a torque", i+1))
		}
	}
	return out
}

// Cover is 25 mm inside and 40 mm elsewhere, and a bar's own diameter.
func (Code) Cover(p *beam.Problem, stirrup, bar bars.Size) units.Length {
	if !p.Brief.Cover.IsZero() {
		return p.Brief.Cover
	}
	least := units.Millimetre.Of(25)
	if p.Brief.Exposure != beam.Interior {
		least = units.Millimetre.Of(40)
	}
	return least.Max(bar.Diameter.Sub(stirrup.Diameter))
}

// Gaps are those of the code.
func (Code) Gaps(p *beam.Problem) bars.Clearances {
	least := units.Millimetre.Of(leastGap).Max(p.Brief.Concrete.Aggregate.Add(units.Millimetre.Of(5)))
	return bars.Clearances{
		InLayer:       bars.Clearance{Least: least, Diameters: gapDiameters},
		BetweenLayers: bars.Clearance{Least: units.Millimetre.Of(layerGap)},
	}
}

// Allows bars of 10 to 32 mm and stirrups up to 12 mm.
func (Code) Allows(use bars.Use, s bars.Size) bool {
	d := s.Diameter.In(units.Millimetre)
	if use == bars.Stirrup {
		return d <= 12
	}
	return d >= 10 && d <= 32
}

// Twists is false: the code knows no torsion.
func (Code) Twists(*beam.Problem) bool { return false }

// Spread is nothing: the code knows no flanges.
func (Code) Spread(*beam.Problem, beam.Face) units.Length { return units.Length{} }

// WidestSpacing is the greatest spacing of rule V6.
func (Code) WidestSpacing(_ *beam.Problem, depth units.Length) units.Length {
	return depth.Scale(spacingShare).Min(units.Millimetre.Of(spacingMost))
}

// LeastTension is the steel of a singly reinforced rectangle, never below the
// least ratio.
func (Code) LeastTension(p *beam.Problem, s beam.Sense, depth units.Length) (units.Area, bool) {
	m, bent := greatest(p, s)
	b, d := p.Brief.Section.Width.In(units.Millimetre), depth.In(units.Millimetre)
	if !bent || d <= 0 {
		return units.Area{}, d > 0
	}
	f := designStress(&p.Brief) * b
	root := d*d - 2*m.Moment.Abs().In(units.NewtonMillimetre)/f
	if root < 0 {
		return units.Area{}, false
	}
	block := d - math.Sqrt(root)
	if block > blockFactor*axisMost*d {
		return units.Area{}, false
	}
	return units.SquareMillimetre.Of(math.Max(f*block/designYield(p.Brief.Reinforcement.Yield), leastRatio*b*d)), true
}

// greatest is the action with the greatest moment of a sense between support
// faces, or among the demands.
func greatest(p *beam.Problem, s beam.Sense) (worst beam.Action, bent bool) {
	consider := func(a beam.Action) {
		if !bent || worst.Moment.Abs().Less(a.Moment.Abs()) {
			worst, bent = a, true
		}
	}
	for span := 1; span <= p.Forces.Spans(); span++ {
		from, to := p.Faces(span)
		if a, ok := p.Forces.Moment(s, span, from, to); ok {
			consider(a)
		}
	}
	for _, d := range p.Forces.Demands() {
		if m := d.Moment.In(units.NewtonMetre); m > 0 && s == beam.Positive || m < 0 && s == beam.Negative {
			consider(d)
		}
	}
	return worst, bent
}

// designStress is the stress of the block in MPa.
func designStress(b *beam.Brief) float64 {
	return blockIntensity * b.Concrete.Strength.In(units.Megapascal) / concreteFactor
}

// designYield is a yield strength over its factor, in MPa.
func designYield(s units.Stress) float64 { return s.In(units.Megapascal) / steelFactor }

// Settle confirms nothing: the code assumes only what it lists as open.
func (Code) Settle(*beam.Trial, []beam.Check, *beam.Register) {}

// Strengths are not offered.
func (Code) Strengths(beam.SectionQuery) (beam.Strengths, error) {
	return beam.Strengths{}, fmt.Errorf("secondcode: section strengths are %w", beam.ErrNotOffered)
}

// Cautions say what the code is.
func (Code) Cautions() []string { return []string{"A made-up code: no basis for a design."} }
