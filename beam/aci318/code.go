package aci318

import (
	"soffit.example/beam"
	"soffit.example/units"
)

// Combinations lists the combinations of 5.3.1 for the loaded cases, and every
// other one with the reason it was dropped.
func (c Code) Combinations(b *beam.Brief) ([]beam.Combination, []beam.DroppedCombination) {
	return c.e.combinations(b)
}

// Scope names the rules that put a problem outside the sectional method of
// chapters 9 and 22.
func (c Code) Scope(p *beam.Problem) []beam.Refusal { return c.e.scopeOf(p) }

// LeastTension is a lower bound of the tension steel of a sense: for strength
// by 22.2 with φ of a tension-controlled section, and for least steel by
// 9.6.1.
func (c Code) LeastTension(p *beam.Problem, s beam.Sense, depth units.Length) (units.Area, bool) {
	return c.e.leastTension(p, s, depth)
}

// Twists reports whether some torque is not below φTth (9.5.4.1).
func (c Code) Twists(p *beam.Problem) bool { return c.e.twists(p) }

// Spread is the width over which 24.3.4 distributes tension steel at a flanged
// face.
func (c Code) Spread(p *beam.Problem, f beam.Face) units.Length { return flangeSpread(p, f) }

// Judge appends the checks of a group.
func (c Code) Judge(dst []beam.Check, g beam.Group, t *beam.Trial) []beam.Check {
	first := len(dst)
	switch g {
	case beam.Fitting:
		dst = c.e.judgeFitting(dst, t)
	case beam.Bending:
		dst = c.e.judgeBending(dst, t)
	case beam.Shearing:
		dst = c.e.judgeShearing(dst, t)
	case beam.Whole:
		dst = c.e.judgeWhole(dst, t)
	}
	for i := first; i < len(dst); i++ {
		dst[i].Detailing = g == beam.Fitting || isArrangement(dst[i].ID)
	}
	return dst
}

// isArrangement reports whether a check outside Fitting is a rule of
// arrangement, which layouts are drawn to exactly.
func isArrangement(id string) bool {
	switch id {
	case "crack.flange-spread", "shear.spacing-along", "shear.spacing-across", "shear.stirrup-size", "shear.stirrup-anchorage", "shear.leg-bars",
		"shear.stirrup-angle", "shear.spacing-inclined", "shear.bent-angle", "shear.bent-spacing",
		"joist.rib-width", "joist.rib-depth", "joist.spacing", "joist.slab",
		"ties.size", "ties.spacing", "ties.held-bars", "side-face.spacing", "bracing.spacing",
		"torsion.spacing-along", "torsion.longitudinal-spacing", "torsion.bar-diameter", "torsion.corners", "torsion.closed", "torsion.wall":
		return true
	}
	return false
}

// Cautions are what a reader must know of any result under this code.
func (c Code) Cautions() []string {
	return []string{
		"This is a calculation aid. It defers to the locally adopted building code, with its amendments, and to the licensed engineer who seals the work.",
		"Judged by " + c.e.title + "; a jurisdiction may have adopted another edition.",
		"Seismic detailing, fire resistance, durability beyond the table of cover, prestress, openings and the design of supports and formwork are not part of this result.",
	}
}
