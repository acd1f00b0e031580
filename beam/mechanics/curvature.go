package mechanics

import (
	"errors"
	"fmt"

	"soffit.example/units"
)

// A CurvaturePoint is the equilibrium of a section at one curvature: a point of
// its moment-curvature line. Concrete in tension carries nothing, so that the
// line is that of a cracked cross-section.
type CurvaturePoint struct {
	Strain      float64 // of the concrete at the compression face, compression positive
	NeutralAxis units.Length
	Curvature   units.Curvature
	Moment      units.Moment // about the centroid of the concrete section, positive in the sense of bending

	// Of the layer farthest from the compression face, positive in tension;
	// zero without steel.
	ExtremeStrain float64

	// How many depths of the neutral axis balance the section at this strain of
	// the compression face. As for [Ultimate] the point is the one of least depth.
	Equilibria int
}

// MomentCurvature appends to dst the equilibria of the section at which the
// compression face reaches each of the strains, and returns the extended slice.
// Strains increase, from 1e-4 of the law's ultimate strain up to that strain,
// where the point is that of [Solver.Ultimate].
//
// breaking is the tension strain that the steel can stand, zero for any: where a
// point would strain the extreme layer more, the curve ends at the strain of the
// compression face at which that layer breaks.
//
// The rotation that a length of beam can go through between first yield and its
// ultimate strain, on which a redistribution of moments rests, is the difference
// of two curvatures of this line times that length.
//
// Its errors are [*InputError] and [*NoEquilibriumError], as where the axial force
// is more than the section can balance at so small a strain; the points before
// are returned with it.
func (s *Solver) MomentCurvature(dst []CurvaturePoint, section Section, law Law, bending Bending, strains []float64, breaking float64) ([]CurvaturePoint, error) {
	if breaking != 0 {
		if err := checkNumber("breaking strain", breaking, 1e-6, 1); err != nil {
			return dst, err
		}
	}
	before := 0.0
	for i, strain := range strains {
		if err := law.checkTruncation("strains", strain); err != nil {
			return dst, indexed(err, i)
		}
		if !(strain > before) {
			return dst, &InputError{Field: fmt.Sprintf("strains[%d]", i), Value: fmt.Sprint(strain), Allowed: fmt.Sprintf("above the one before it, %v", before)}
		}
		p, err := s.curvaturePoint(section, law, bending, strain)
		if err != nil {
			return dst, indexed(err, i)
		}
		if breaking != 0 && p.ExtremeStrain > breaking {
			whole, _ := s.part(section, law, bending, before, p, func(p CurvaturePoint) bool { return p.ExtremeStrain > breaking })
			if whole.Strain > 0 {
				dst = append(dst, whole)
			}
			return dst, nil
		}
		dst = append(dst, p)
		before = strain
	}
	return dst, nil
}

// indexed names the element of strains that an error is of.
func indexed(err error, i int) error {
	if input, ok := errors.AsType[*InputError](err); ok {
		if input.Field == "strains" {
			input.Field = fmt.Sprintf("strains[%d]", i)
		}
		return err
	}
	return fmt.Errorf("strains[%d]: %w", i, err)
}

// AtCurvature returns the equilibrium of the section at a curvature, from 1e-6 of
// that of [Solver.Ultimate] up to it. Where the edge of a block passes a bar the
// least depth of the neutral axis can leap as the strain of the compression face
// rises: the line doubles back, and one of its points of that curvature is
// returned, or leaps over the curvature, and the point beyond the leap is.
//
// Its errors are [*InputError] and [*NoEquilibriumError].
func (s *Solver) AtCurvature(section Section, law Law, bending Bending, curvature units.Curvature) (CurvaturePoint, error) {
	if err := s.Ultimate(&s.trial, section, law, bending); err != nil {
		return CurvaturePoint{}, err
	}
	end := pointOf(&s.trial, law.ultimate)
	if !(curvature.In(units.PerMetre) >= 1e-6*end.Curvature.In(units.PerMetre) && curvature.AtMost(end.Curvature)) {
		return CurvaturePoint{}, &InputError{Field: "curvature", Value: curvature.String(),
			Allowed: "from 1e-6 of the ultimate curvature up to it, " + end.Curvature.String()}
	}
	_, reached := s.part(section, law, bending, law.pieces[0].from*law.ultimate, end, func(p CurvaturePoint) bool { return !p.Curvature.Less(curvature) })
	return reached, nil
}

// curvaturePoint returns the equilibrium with the compression face at a strain.
func (s *Solver) curvaturePoint(section Section, law Law, bending Bending, strain float64) (CurvaturePoint, error) {
	cut := law.truncated(s.pieces, strain)
	s.pieces = cut.pieces
	if err := cut.checkStressed("strains"); err != nil {
		return CurvaturePoint{}, err
	}
	if err := s.Ultimate(&s.trial, section, cut, bending); err != nil {
		return CurvaturePoint{}, err
	}
	return pointOf(&s.trial, strain), nil
}

func pointOf(u *Ultimate, strain float64) CurvaturePoint {
	return CurvaturePoint{
		Strain:        strain,
		NeutralAxis:   u.NeutralAxis,
		Curvature:     u.Curvature,
		Moment:        u.Nominal,
		ExtremeStrain: u.ExtremeStrain,
		Equilibria:    u.Equilibria,
	}
}

// part halves the strains of the compression face between low and those of the
// point beyond until no float64 lies between the last point that is not over and
// the first that is. A strain at which nothing balances is not over. Where no
// point is not over, the first point returned is zero.
func (s *Solver) part(section Section, law Law, bending Bending, low float64, beyond CurvaturePoint, over func(CurvaturePoint) bool) (last, first CurvaturePoint) {
	first = beyond
	for range 200 {
		mid := low + (first.Strain-low)/2
		if mid <= low || mid >= first.Strain {
			break
		}
		p, err := s.curvaturePoint(section, law, bending, mid)
		switch {
		case err != nil: // too small a strain for the axial force, or for any stress
			low = mid
		case over(p):
			first = p
		default:
			low, last = mid, p
		}
	}
	return last, first
}
