package aci318

import (
	"errors"
	"fmt"
	"math"

	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// flexure is the strength in bending of one section in one sense (22.2, 22.3),
// with what Table 21.2.2 and 9.3.3.1 make of its strain. Stresses, forces and
// strains of the layers stay in the kernel's result.
type flexure struct {
	blockFactor float64 // β1
	yieldStrain float64 // εty as strains are classed by
	strain      float64 // εt, tension positive
	leastStrain float64 // 9.3.3.1
	phi         float64
	class       string
	nominal     units.Moment // Mn
	design      units.Moment // φMn

	axis    units.Length // c, of which strain comes
	extreme units.Length // dt, of the extreme layer
	yield   units.Stress // the greatest of the steel in tension, by which strains are classed
	axial   units.Force  // Pn that acts too, compression positive
	all     bool         // the bars beyond the spread of 24.3.4 pull too
}

// block is the rectangular stress block of 22.2.2.4 as a stress law.
func (e *edition) block(strength units.Stress) (mechanics.Law, error) {
	return mechanics.RectangularBlock(strength.Scale(blockIntensity), e.blockFactor(strength), crushing)
}

// reblock returns the law of a concrete, which is the kept one if that is the
// same but for rounding: making a law allocates.
func (e *edition) reblock(kept mechanics.Law, strength units.Stress) (mechanics.Law, error) {
	if kept.Ultimate() == crushing && kept.Stress(crushing) == strength.Scale(blockIntensity) {
		if _, depth := kept.Resultant(); math.Abs(2*depth-e.blockFactor(strength)) < 1e-14 {
			return kept, nil
		}
	}
	return e.block(strength)
}

// barSteel is the elastic and perfectly plastic steel of 20.2.2.1.
func (e *edition) barSteel(yield units.Stress) mechanics.Steel {
	return mechanics.Steel{Modulus: e.steelModulus(), Yield: yield}
}

func bendingOf(s beam.Sense, r *beam.Readings) mechanics.Bending {
	var b mechanics.Bending
	if s == beam.Negative {
		b.Sense = mechanics.Hogging
	}
	if r.IgnoreDisplaced {
		b.Displaced = mechanics.Ignore
	}
	return b
}

// classify draws the strength from an equilibrium. yield is the greatest of the
// steel in tension.
func (e *edition) classify(u *mechanics.Ultimate, strength, yield units.Stress, r *beam.Readings) flexure {
	f := flexure{
		blockFactor: e.blockFactor(strength),
		yieldStrain: e.yieldStrain(yield, r.RoundedYield),
		strain:      u.ExtremeStrain,
		nominal:     u.Nominal,
		axis:        u.NeutralAxis,
		extreme:     u.ExtremeDepth,
		yield:       yield,
	}
	f.leastStrain = e.reduction.leastStrain(f.yieldStrain)
	f.phi, f.class = e.reduction.flexure(f.strain, f.yieldStrain)
	f.design = f.nominal.Scale(f.phi)
	return f
}

// trialSection is the section of a trial bent in a sense, for the kernel: of the
// bars beside the web only those over which 24.3.4 spreads the tension steel.
func (e *edition) trialSection(t *beam.Trial, s beam.Sense) mechanics.Section {
	return mechanics.Section{Parts: t.Geometry.Parts, Layers: t.WithinSpread(s.TensionFace(), t.Layers(s, e.steelModulus()))}
}

// trialFlexure is the strength of a trial in one sense. The equilibrium stays
// in t.Ultimate. ok is false where the section has no equilibrium: there is
// no steel to pull.
func (e *edition) trialFlexure(t *beam.Trial, s beam.Sense) (f flexure, ok bool) {
	return e.trialUnder(t, s, units.Force{})
}

// trialUnder is trialFlexure with a factored axial force acting too.
func (e *edition) trialUnder(t *beam.Trial, s beam.Sense, axial units.Force) (f flexure, ok bool) {
	if t.Steel(s.TensionFace()).Count == 0 {
		return flexure{}, false
	}
	return e.solveTrial(t, s, e.trialSection(t, s), axial)
}

// trialStrained is trialUnder with every bar of the tension face pulling, also
// beyond the spread of 24.3.4: bars that are there lower the strain, whether or
// not the strength counts them.
func (e *edition) trialStrained(t *beam.Trial, s beam.Sense, axial units.Force) (f flexure, ok bool) {
	f, ok = e.solveTrial(t, s, mechanics.Section{Parts: t.Geometry.Parts, Layers: t.Layers(s, e.steelModulus())}, axial)
	f.all = true
	return f, ok
}

// solveTrial finds the equilibrium of a trial with the steel of a section.
func (e *edition) solveTrial(t *beam.Trial, s beam.Sense, section mechanics.Section, axial units.Force) (f flexure, ok bool) {
	b := &t.Brief
	law, err := e.reblock(t.Law, b.Concrete.Strength)
	if err != nil {
		return flexure{}, false
	}
	t.Law = law
	f, err = e.solveUnder(&t.Solver, &t.Ultimate, section, law, bendingOf(s, &b.Readings), b.Concrete.Strength, &b.Readings, axial)
	return f, err == nil
}

// mostRounds bounds the search for φ under an axial force, which settles by a
// digit or more a round.
const mostRounds = 40

// solveUnder finds the equilibrium under a factored axial force: the section
// carries Pn = Pu/φ, with the φ of its own strain (21.2.2).
func (e *edition) solveUnder(solver *mechanics.Solver, u *mechanics.Ultimate, section mechanics.Section, law mechanics.Law,
	bending mechanics.Bending, strength units.Stress, r *beam.Readings, axial units.Force) (flexure, error) {
	phi := e.reduction.tension
	var yield units.Stress
	var f flexure
	for range mostRounds {
		bending.Axial = axial.Scale(1 / phi)
		if err := solver.Ultimate(u, section, law, bending); err != nil {
			return flexure{}, err
		}
		// Never less than in the round before, so that the rounds settle.
		yield = yield.Max(tensionYield(section, u))
		f = e.classify(u, strength, yield, r)
		f.axial = bending.Axial
		if axial.IsZero() || math.Abs(f.phi-phi) <= 1e-13 {
			break
		}
		phi = f.phi
	}
	return f, nil
}

// noteGrades is how steel of several grades is read.
const noteGrades = "where steel of several yield strengths pulls, φ, the yield strain and the least strain go by the greatest of them (21.2.2, 9.3.3.1), least steel by the least (9.6.1.2)"

// crossCheckTolerance is the relative difference that two routes to the same
// strength may show: both are exact but for rounding and the width of a fibre.
const crossCheckTolerance = 1e-6

const crossCheckMethod = "fibre integration of strain compatibility"

// crossCheck finds the same strength by fibres.
func crossCheck(section mechanics.Section, law mechanics.Law, bending mechanics.Bending, nominal units.Moment) (beam.CrossCheck, error) {
	u, err := section.Fibres(law, bending)
	if err != nil {
		return beam.CrossCheck{}, err
	}
	c := beam.CrossCheck{Method: crossCheckMethod, Nominal: u.Nominal}
	if !nominal.IsZero() {
		c.Difference = u.Nominal.Sub(nominal).Abs().Ratio(nominal.Abs())
	}
	return c, nil
}

// tensionSide is the steel by which d, ρw and least steel go: the layers in
// tension farther than two-thirds of the depth from the compression face, which
// the commentary to Table 22.5.5.1 sums, or every layer in tension where none
// lies there. A layer nearer the neutral axis that happens to be stretched is no
// tension reinforcement; counted, it would pull d up and stand in for bars that
// are not there.
func tensionSide(u *mechanics.Ultimate, section mechanics.Section) (units.Area, units.Length) {
	near := section.Depth().Scale(2.0 / 3)
	var area units.Area
	moment := 0.0
	for i := range u.Layers {
		l := &u.Layers[i]
		if l.Strain < 0 && near.Less(l.Depth) {
			a := section.Layers[i].Area
			area = area.Add(a)
			moment += a.In(units.SquareMetre) * l.Depth.In(units.Metre)
		}
	}
	if area.IsZero() {
		return u.TensionArea, u.EffectiveDepth
	}
	return area, units.Metre.Of(moment / area.In(units.SquareMetre))
}

// flexureUnder is the full account of a section's strength in bending, but for
// least steel, under a factored axial force: the lesser strength of those with and
// without it, with its own strain; zero where
// nothing balances the section under the force. strain is the lesser of the two
// strains, to be held against 9.3.3.1. Layers are measured from the top face,
// whichever the sense.
func (e *edition) flexureUnder(section mechanics.Section, strength units.Stress, s beam.Sense, r *beam.Readings, axial units.Force) (out beam.FlexureStrength, strain float64, err error) {
	law, err := e.block(strength)
	if err != nil {
		return out, 0, err
	}
	bending := bendingOf(s, r)
	var solver mechanics.Solver
	var u mechanics.Ultimate
	f, err := e.solveUnder(&solver, &u, section, law, bending, strength, r, units.Force{})
	if err != nil {
		return out, 0, err
	}
	strain = f.strain
	balanced := true
	if !axial.IsZero() {
		var under mechanics.Ultimate
		with, err := e.solveUnder(&solver, &under, section, law, bending, strength, r, axial)
		switch {
		case noEquilibrium(err):
			balanced = false
		case err != nil:
			return out, 0, err
		default:
			strain = math.Min(strain, with.strain)
			if with.design.Less(f.design) {
				u, f, bending.Axial = under, with, with.axial
			}
		}
	}
	area, depth := tensionSide(&u, section)
	out = beam.FlexureStrength{
		Sense: s, NeutralAxis: u.NeutralAxis, BlockDepth: u.NeutralAxis.Scale(f.blockFactor), BlockFactor: f.blockFactor,
		EffectiveDepth: depth, ExtremeDepth: u.ExtremeDepth, ExtremeStrain: f.strain, YieldStrain: f.yieldStrain,
		Class: f.class, Phi: f.phi, Nominal: f.nominal, Design: f.design,
		TensionSteel: area, LeastStrain: f.leastStrain, Equilibria: u.Equilibria,
		Layers: make([]beam.LayerState, len(u.Layers)),
	}
	for i, l := range u.Layers {
		out.Layers[i] = beam.LayerState{Strain: -l.Strain, Stress: l.Stress.Neg(), Force: l.Force.Neg()}
	}
	if out.CrossCheck, err = crossCheck(section, law, bending, u.Nominal); err != nil {
		return beam.FlexureStrength{}, 0, fmt.Errorf("second route to the strength in bending: %w", err)
	}
	if out.CrossCheck.Difference > crossCheckTolerance {
		return beam.FlexureStrength{}, 0, &DisagreementError{Nominal: u.Nominal, Other: out.CrossCheck.Nominal}
	}
	if !balanced || out.Design.Compare(units.Moment{}) < 0 {
		out.Nominal, out.Design = units.Moment{}, units.Moment{}
	}
	return out, strain, nil
}

// DisagreementError says that two independent routes to one strength differ by
// more than rounding. It is a fault of this program, not of the input, and no
// strength may be given.
type DisagreementError struct {
	Nominal, Other units.Moment
}

func (e *DisagreementError) Error() string {
	return fmt.Sprintf("aci318: block equilibrium gives a nominal moment of %s, fibre integration %s", e.Nominal, e.Other)
}

// tensionYield is the greatest yield strength of the layers in tension, by whose
// yield strain a section is classed (21.2.2): the steel that asks for most.
// Where steel of several grades pulls, the grade of the one bar that lies
// farthest out would class the others, however little it carries.
func tensionYield(section mechanics.Section, u *mechanics.Ultimate) units.Stress {
	var fy units.Stress
	for i := range section.Layers {
		if u.Layers[i].Strain < 0 {
			fy = fy.Max(section.Layers[i].Steel.Yield)
		}
	}
	if fy.IsZero() { // an axial compression presses on all of them
		return greatestLayerYield(section)
	}
	return fy
}

// greatestLayerYield is the greatest yield strength of the layers.
func greatestLayerYield(section mechanics.Section) units.Stress {
	var fy units.Stress
	for i := range section.Layers {
		fy = fy.Max(section.Layers[i].Steel.Yield)
	}
	return fy
}

// noEquilibrium reports whether an error says that nothing balances the
// section.
func noEquilibrium(err error) bool {
	var none *mechanics.NoEquilibriumError
	return errors.As(err, &none)
}
