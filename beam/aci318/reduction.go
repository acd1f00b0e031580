package aci318

import "soffit.example/units"

// reductionRules are the strength reduction factors of 21.2 and the strain
// limit of 9.3.3.1.
type reductionRules struct {
	compression, tension float64 // φ of compression- and tension-controlled sections, Table 21.2.2
	shear, torsion       float64 // Table 21.2.1

	// The strain at which sections are tension-controlled and the least strain
	// of a beam are each a fixed value in 318-14; in 318-19 both are the yield
	// strain plus margin, and the fixed values are zero.
	fixedTension, fixedLeast float64
	margin                   float64
}

var reduction14 = reductionRules{
	compression: 0.65, tension: 0.90, shear: 0.75, torsion: 0.75,
	fixedTension: 0.005, fixedLeast: 0.004,
}

var reduction19 = reductionRules{
	compression: 0.65, tension: 0.90, shear: 0.75, torsion: 0.75,
	margin: 0.003,
}

// Class words of 21.2.2.
const (
	tensionControlled     = "tension-controlled"
	transition            = "transition"
	compressionControlled = "compression-controlled"
)

// tensionStrain is the net tensile strain from which a section is
// tension-controlled (Table 21.2.2).
func (r *reductionRules) tensionStrain(yieldStrain float64) float64 {
	if r.fixedTension > 0 {
		return r.fixedTension
	}
	return yieldStrain + r.margin
}

// leastStrain is the least net tensile strain of a beam (9.3.3.1).
func (r *reductionRules) leastStrain(yieldStrain float64) float64 {
	if r.fixedLeast > 0 {
		return r.fixedLeast
	}
	return yieldStrain + r.margin
}

// flexure is φ for a net tensile strain εt of the extreme layer, and the class
// of the section (Table 21.2.2, ties other than spirals).
func (r *reductionRules) flexure(strain, yieldStrain float64) (phi float64, class string) {
	full := r.tensionStrain(yieldStrain)
	switch {
	case units.AtMost(full, strain):
		return r.tension, tensionControlled
	case units.AtMost(strain, yieldStrain):
		return r.compression, compressionControlled
	}
	return r.compression + (r.tension-r.compression)*(strain-yieldStrain)/(full-yieldStrain), transition
}
