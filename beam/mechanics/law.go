package mechanics

import (
	"fmt"
	"math"
	"slices"

	"soffit.example/units"
)

// A Law is the stress of concrete as a function of its strain, compression
// positive, from zero strain to the ultimate strain. Concrete in tension, and
// concrete strained beyond the ultimate, carries nothing.
//
// A Law is immutable and safe for concurrent use. Making one allocates; using
// one does not, so make it once for a concrete and keep it. The zero Law is not
// a law of any concrete and is refused wherever it is used.
type Law struct {
	ultimate float64
	degree   int // greatest degree of the pieces
	pieces   []piece
}

// A piece is one polynomial of a law. Strains are kept as fractions of the
// ultimate strain, which keeps every coefficient near the stress in size.
type piece struct {
	from     float64    // where the piece starts
	stress   polynomial // Pa, in the distance from there
	integral polynomial // of the stress over the fraction, from the law's first piece on
	second   polynomial // the integral of that
}

// Strains and stresses that a law may have. They are no rule for concrete: they
// keep the arithmetic finite.
const (
	leastUltimate = 1e-5
	mostUltimate  = 0.1
	leastStress   = 1.0  // Pa
	mostStress    = 1e15 // Pa
)

// RectangularBlock returns the law of a constant intensity over depthFactor
// times the neutral-axis depth, measured from the compression face: the
// equivalent block of C. S. Whitney (1937), in which the intensity and the
// factor come from a design code. depthFactor is from 0.01 to 1.
func RectangularBlock(intensity units.Stress, depthFactor, ultimate float64) (Law, error) {
	if err := checkLaw("intensity", intensity, ultimate); err != nil {
		return Law{}, err
	}
	if err := checkNumber("depth factor", depthFactor, 0.01, 1); err != nil {
		return Law{}, err
	}
	start := piece{from: 1 - depthFactor}
	start.stress[0] = intensity.In(units.Pascal)
	return newLaw(ultimate, start), nil
}

// ParabolaRectangle returns the law strength·(1 - (1 - strain/peak)^exponent) up
// to the peak strain, and the strength from there to the ultimate strain:
// EN 1992-1-1:2004 3.1.7(1), expressions (3.17) and (3.18). exponent is from 1
// to 4; 1 and 2 are kept exactly, others are fitted as by [Curve].
func ParabolaRectangle(strength units.Stress, peak, ultimate, exponent float64) (Law, error) {
	if err := checkLaw("strength", strength, ultimate); err != nil {
		return Law{}, err
	}
	if err := checkNumber("peak strain", peak, 0.01*ultimate, ultimate); err != nil {
		return Law{}, err
	}
	if err := checkNumber("exponent", exponent, 1, 4); err != nil {
		return Law{}, err
	}
	f, p := strength.In(units.Pascal), peak/ultimate
	var rising []piece
	switch exponent {
	case 1:
		rising = []piece{{stress: polynomial{0, f / p}}}
	case 2:
		rising = []piece{{stress: polynomial{0, 2 * f / p, -f / (p * p)}}}
	default:
		curve := func(s float64) float64 { return f * (1 - math.Pow(math.Max(0, 1-s/p), exponent)) }
		var err error
		if rising, err = fit(curve, []float64{0, p}); err != nil {
			return Law{}, err
		}
	}
	if p < 1 {
		rising = append(rising, piece{from: p, stress: polynomial{f}})
	}
	return newLaw(ultimate, rising...), nil
}

// Bilinear returns the law that rises in proportion to the strain up to the peak
// strain and keeps its strength from there to the ultimate strain:
// EN 1992-1-1:2004 3.1.7(2).
func Bilinear(strength units.Stress, peak, ultimate float64) (Law, error) {
	return ParabolaRectangle(strength, peak, ultimate, 1)
}

// A Point is a stress at a strain, both compression positive.
type Point struct {
	Strain float64
	Stress units.Stress
}

// Polyline returns the law of straight lines between points. Strains increase
// strictly from zero or more; the last is the ultimate strain. Below the first
// point the stress is zero. At least two points are needed, and one of them
// has a stress.
func Polyline(points ...Point) (Law, error) {
	if len(points) < 2 {
		return Law{}, &InputError{Field: "points", Value: fmt.Sprint(len(points)), Allowed: "at least 2"}
	}
	ultimate := points[len(points)-1].Strain
	var most units.Stress
	for i, p := range points {
		field := fmt.Sprintf("points[%d]", i)
		low, high := 0.0, mostUltimate
		if i > 0 {
			// Pieces thinner than this drown in rounding.
			low = points[i-1].Strain + 1e-9*ultimate
		}
		if err := checkNumber(field+".strain", p.Strain, low, high); err != nil {
			return Law{}, err
		}
		if s := p.Stress.In(units.Pascal); !(s >= 0 && s <= mostStress) {
			return Law{}, &InputError{Field: field + ".stress", Value: p.Stress.String(), Allowed: "from 0 to 1e9 MPa"}
		}
		most = most.Max(p.Stress)
	}
	if err := checkLaw("greatest stress", most, ultimate); err != nil {
		return Law{}, err
	}
	pieces := make([]piece, len(points)-1)
	for i := range pieces {
		a, b := points[i], points[i+1]
		from, to := a.Strain/ultimate, b.Strain/ultimate
		f := a.Stress.In(units.Pascal)
		pieces[i] = piece{from: from, stress: polynomial{f, (b.Stress.In(units.Pascal) - f) / (to - from)}}
	}
	return newLaw(ultimate, pieces...), nil
}

// Curve returns a law fitted to any function of strain from zero to the ultimate
// strain. The fit is continuous cubics, within 1e-9 of the greatest stress. The
// function is smooth between the kinks listed, is nowhere negative, and may
// jump at a kink. A function too rough to fit is an error that names the
// strain.
func Curve(stress func(strain float64) units.Stress, ultimate float64, kinks ...float64) (Law, error) {
	if err := checkNumber("ultimate strain", ultimate, leastUltimate, mostUltimate); err != nil {
		return Law{}, err
	}
	joints := []float64{0}
	for i, k := range kinks {
		low := joints[len(joints)-1]*ultimate + 1e-6*ultimate
		if err := checkNumber(fmt.Sprintf("kinks[%d]", i), k, low, ultimate*(1-1e-6)); err != nil {
			return Law{}, err
		}
		joints = append(joints, k/ultimate)
	}
	joints = append(joints, 1)
	pieces, err := fit(func(s float64) float64 { return stress(s * ultimate).In(units.Pascal) }, joints)
	if err != nil {
		return Law{}, fmt.Errorf("curve with ultimate strain %v: %w", ultimate, err)
	}
	return newLaw(ultimate, pieces...), nil
}

// mostLawDegree is that of the pieces that fit makes.
const mostLawDegree = 3

// newLaw completes pieces that are in order and whose stresses are set.
func newLaw(ultimate float64, pieces ...piece) Law {
	law := Law{ultimate: ultimate, pieces: pieces}
	for i := range pieces {
		p := &pieces[i]
		if i > 0 {
			before := &pieces[i-1]
			width := p.from - before.from
			p.integral[0] = before.integral.at(width)
			p.second[0] = before.second.at(width)
		}
		for j, c := range p.stress[:mostLawDegree+1] {
			p.integral[j+1] = c / float64(j+1)
			if c != 0 && j > law.degree {
				law.degree = j
			}
		}
		for j, c := range p.integral[:mostLawDegree+2] {
			p.second[j+1] = c / float64(j+1)
		}
	}
	return law
}

// Ultimate returns the strain at which the law ends.
func (l Law) Ultimate() float64 { return l.ultimate }

// Stress returns the stress at a strain, compression positive in both. At a
// strain where the law jumps it is the stress of the greater strains.
func (l Law) Stress(strain float64) units.Stress {
	return units.Pascal.Of(l.at(strain / l.ultimate))
}

// at returns the stress in Pa at a fraction of the ultimate strain.
func (l Law) at(s float64) float64 {
	if len(l.pieces) == 0 || !(s >= l.pieces[0].from && s <= 1+1e-9) {
		return 0
	}
	i := len(l.pieces) - 1
	if len(l.pieces) > 8 {
		n, found := slices.BinarySearchFunc(l.pieces, s, func(p piece, s float64) int {
			switch {
			case p.from < s:
				return -1
			case p.from > s:
				return 1
			}
			return 0
		})
		if i = n; !found {
			i--
		}
	}
	for l.pieces[i].from > s {
		i--
	}
	return l.pieces[i].stress.at(s - l.pieces[i].from)
}

// Kinks returns the strains at which the law passes from one polynomial to the
// next, in order. The first is where stress begins; the ultimate strain is not
// among them.
func (l Law) Kinks() []float64 {
	kinks := make([]float64, len(l.pieces))
	for i, p := range l.pieces {
		kinks[i] = p.from * l.ultimate
	}
	return kinks
}

// leastTruncation is the least strain, over the ultimate strain, at which a law
// may be cut off.
const leastTruncation = 1e-4

// Truncated returns the law cut off at a strain, which becomes its ultimate
// strain: of a section under it the equilibrium is that at which the compression
// face reaches this strain. The strain is from 1e-4 of the ultimate strain up to
// the ultimate strain, and the law has some stress below it.
func (l Law) Truncated(strain float64) (Law, error) {
	if err := l.checkTruncation("strain", strain); err != nil {
		return Law{}, err
	}
	t := l.truncated(nil, strain)
	if err := t.checkStressed("strain"); err != nil {
		return Law{}, err
	}
	return t, nil
}

func (l Law) checkTruncation(field string, strain float64) error {
	if err := l.check(); err != nil {
		return err
	}
	return checkNumber(field, strain, leastTruncation*l.ultimate, l.ultimate)
}

// checkStressed reports a truncated law that no stress is left of.
func (l Law) checkStressed(field string) error {
	if mean, _ := l.resultant(); mean < leastStress {
		return &InputError{Field: field, Value: fmt.Sprint(l.ultimate), Allowed: "beyond where the law's stress begins"}
	}
	return nil
}

// truncated cuts the law off at a strain above zero. It keeps its pieces in
// those given, so that none need be allocated.
func (l Law) truncated(pieces []piece, strain float64) Law {
	share := strain / l.ultimate
	pieces = pieces[:0]
	for i := range l.pieces {
		p := &l.pieces[i]
		if share-p.from <= 1e-9*share {
			break // a piece thinner than this drowns in rounding
		}
		q, scale := piece{from: p.from / share}, 1.0
		for j, c := range p.stress {
			q.stress[j] = c * scale
			scale *= share
		}
		pieces = append(pieces, q)
	}
	return newLaw(strain, pieces...)
}

// Resultant returns the mean stress over the neutral-axis depth of a rectangle
// whose compression face is at the ultimate strain, and the depth of the
// resultant from that face as a fraction of the neutral-axis depth: for a block
// of factor b, b times the intensity, and b/2.
func (l Law) Resultant() (mean units.Stress, depth float64) {
	force, moment := l.resultant()
	if force == 0 {
		return units.Stress{}, 0
	}
	return units.Pascal.Of(force), moment / force
}

func (l Law) resultant() (force, moment float64) {
	for i := range l.pieces {
		f, m := l.sum(i, l.pieces[i].from, l.end(i))
		force += f
		moment += m
	}
	return force, moment
}

// end returns where piece i ends, as a fraction of the ultimate strain.
func (l Law) end(i int) float64 {
	if i+1 < len(l.pieces) {
		return l.pieces[i+1].from
	}
	return 1
}

// sum integrates the stress of piece i between two fractions of the ultimate
// strain, and the stress times its distance from 1. Gauss's three points are
// exact for it, and no difference of large integrals is taken.
func (l Law) sum(i int, from, to float64) (force, moment float64) {
	p := &l.pieces[i]
	half, mid := (to-from)/2, (to+from)/2
	if l.degree == 0 {
		force = p.stress[0] * (to - from)
		return force, force * (1 - mid)
	}
	const node, outer, inner = 0.7745966692414834, 5.0 / 9, 8.0 / 9 // node = √(3/5)
	s1, s3 := mid-node*half, mid+node*half
	f1 := outer * half * p.stress.at(s1-p.from)
	f2 := inner * half * p.stress.at(mid-p.from)
	f3 := outer * half * p.stress.at(s3-p.from)
	return f1 + f2 + f3, f1*(1-s1) + f2*(1-mid) + f3*(1-s3)
}

// taper integrates as sum does, with a width that varies in a straight line from
// below at the lesser fraction to above at the greater one. Three points are
// exact for it too: the integrands are of the fifth degree at most.
func (l Law) taper(i int, from, to, below, above float64) (force, moment float64) {
	p := &l.pieces[i]
	half, mid := (to-from)/2, (to+from)/2
	spread, width := (above-below)/2, (above+below)/2
	const node, outer, inner = 0.7745966692414834, 5.0 / 9, 8.0 / 9
	s1, s3 := mid-node*half, mid+node*half
	f1 := outer * half * (width - node*spread) * p.stress.at(s1-p.from)
	f2 := inner * half * width * p.stress.at(mid-p.from)
	f3 := outer * half * (width + node*spread) * p.stress.at(s3-p.from)
	return f1 + f2 + f3, f1*(1-s1) + f2*(1-mid) + f3*(1-s3)
}

// check reports a Law that no constructor made.
func (l Law) check() error {
	if len(l.pieces) == 0 {
		return &InputError{Field: "law", Value: "the zero Law", Allowed: "a law made by RectangularBlock, ParabolaRectangle, Bilinear, Polyline or Curve"}
	}
	return nil
}

func checkLaw(field string, stress units.Stress, ultimate float64) error {
	if err := checkNumber("ultimate strain", ultimate, leastUltimate, mostUltimate); err != nil {
		return err
	}
	return checkStress(field, stress)
}
