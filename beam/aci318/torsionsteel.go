package aci318

import (
	"math"

	"soffit.example/beam"
	"soffit.example/units"
)

// torsionCage is a section with closed stirrups of one size as 22.7.6 and
// 22.7.7 see it, in the units of the edition.
type torsionCage struct {
	width, depth, cover, tie float64
	x1, y1                   float64 // between the centrelines of the legs
	area, perimeter          float64 // Aoh and ph; zero where the stirrup encloses nothing
	flow                     float64 // Ao
	angle, cot               float64 // θ in degrees, and its cotangent
	fyt                      float64 // as it may be used in torsion
	fytCapped                bool
	phi                      float64

	fc       float64
	enclosed float64 // Acp
	web      float64 // bw
	pull     float64 // 5√f'c Acp of 9.6.4.3
	least    float64 // 25 bw/fyt of 9.6.4.3
	along    float64 // greatest spacing of the stirrups

	voids, walls     bool    // there are hollows; they make it a hollow section
	beside, flat     float64 // thickness of the walls beside them, and of the thinner one above or below
	wall, wallNeeded float64 // from the stirrup's centreline to the nearest hollow, 9.7.6.3.4
}

// torsionCage encloses a section with stirrups under a clear cover. Without
// stirrups the size is nil.
func (e *edition) torsionCage(b *beam.Section, g *beam.Geometry, t *torsionStrength, cover, tie units.Length, yield units.Stress, angle float64) torsionCage {
	r := &e.torsion
	c := torsionCage{
		width: e.lengthIn(b.Width), depth: e.lengthIn(b.Depth), cover: e.lengthIn(cover), tie: e.lengthIn(tie),
		angle: angle, phi: t.phi, fc: t.strength, enclosed: t.enclosed, web: e.lengthIn(g.Web), voids: g.Hollow, walls: t.walls,
		fyt: min(e.stressIn(yield), e.materials.mostTorsionYield),
	}
	if c.angle == 0 {
		c.angle = usualDiagonal
	}
	c.cot = 1
	if c.angle != usualDiagonal { // whose cotangent is one exactly
		c.cot = 1 / math.Tan(c.angle*math.Pi/180)
	}
	c.fytCapped = c.fyt < e.stressIn(yield)
	c.x1, c.y1 = c.width-2*c.cover-c.tie, c.depth-2*c.cover-c.tie
	c.pull = r.longitudinal * math.Sqrt(c.fc) * c.enclosed
	c.least = r.floor * c.web / c.fyt
	if c.x1 > 0 && c.y1 > 0 {
		c.area, c.perimeter = c.x1*c.y1, 2*(c.x1+c.y1)
		c.flow = flowShare * c.area
		c.along = min(c.perimeter/perimeters, r.along)
		c.wallNeeded = wallShare * c.area / c.perimeter
	}
	if c.voids {
		c.beside, c.flat = e.lengthIn(g.SideWall), e.lengthIn(g.TopWall.Min(g.BottomWall))
		c.wall = min(c.beside, c.flat) - c.cover - c.tie/2
	}
	return c
}

// trialCage is the cage of a trial with stirrups of a diameter.
func (e *edition) trialCage(t *beam.Trial, s *torsionStrength, tie units.Length) torsionCage {
	b := &t.Brief
	return e.torsionCage(&b.Section, &t.Geometry, s, t.Cover, tie, b.Reinforcement.StirrupYield, b.Readings.TorsionAngle)
}

// sectionTorsion is one section under shear and a torque that is not
// neglected, in the units of the edition.
type sectionTorsion struct {
	sectionTorque
	shearStress float64 // Vu/(bw d)
	beside      float64 // stress of the torque in the walls or sides that shear acts in
	flat        float64 // and in the walls above and below a hollow
	stress      float64 // what section adequacy compares
	limit       float64
	flatGoverns bool

	leg   float64 // At/s that the torque needs of one leg
	shear float64 // Av/s that the shear needs of all
	lift  float64 // Av/s that lifts a load hung here
	outer float64 // what all of these need of each outer leg

	broken string // why the section has no strength; empty if it has
}

// What leaves a section without strength in torsion.
const (
	noteNoCage  = "the cover leaves no room for a closed stirrup"
	noteNoWall  = "no wall stands between a hollow and the side of the strip in which the stirrups stand"
	noteNoDepth = "there is no steel in tension to measure d to"
)

// at evaluates a section: web and s are its shear, legs the legs of each
// stirrup, and lift what these carry besides.
func (c *torsionCage) at(q sectionTorque, web *webSteel, s *sectionShear, legs, lift float64) sectionTorsion {
	v := sectionTorsion{sectionTorque: q, lift: lift}
	b := &web.bare
	switch {
	case c.area == 0:
		v.broken = noteNoCage
		return v
	case b.web <= 0:
		v.broken = noteNoDepth
		return v
	case c.voids && min(c.beside, c.flat) <= 0:
		v.broken = noteNoWall
		return v
	}
	v.shearStress = s.shear / b.web
	v.limit = s.limit / b.web
	if c.walls {
		// Shear acts in the walls beside the hollow, where it adds up with the
		// torque; those above and below have the torque alone (R22.7.7.1).
		v.beside, v.flat = c.sideStress(q.used), c.wallStress(q.used, c.flat)
		v.stress = v.shearStress + v.beside
		if v.flatGoverns = v.flat > v.stress; v.flatGoverns {
			v.stress = v.flat
		}
	} else {
		v.beside = c.sideStress(q.used)
		v.stress = math.Hypot(v.shearStress, v.beside)
	}
	v.leg = c.legFor(q.used)
	if web.fyt > 0 {
		// Bent bars are not counted beside a torque, whose diagonals wind round
		// the section.
		v.shear = s.needed / (web.fyt * b.d)
	}
	v.outer = (v.shear+v.lift)/legs + v.leg
	return v
}

// thin reports whether 22.7.7.2 goes by the thickness of a wall.
func (c *torsionCage) thin(wall float64) bool { return wall < c.area/c.perimeter }

// sideStress is the stress of a torque along the sides: of a hollow section in
// the walls there.
func (c *torsionCage) sideStress(torque float64) float64 {
	if c.walls {
		return c.wallStress(torque, c.beside)
	}
	return torque * c.perimeter / (sectionShare * c.area * c.area)
}

// wallStress is the stress of a torque in the wall of a hollow section.
func (c *torsionCage) wallStress(torque, wall float64) float64 {
	if c.thin(wall) {
		return torque / (sectionShare * c.area * wall)
	}
	return torque * c.perimeter / (sectionShare * c.area * c.area)
}

// legFor is At/s of one leg for a torque (22.7.6.1(a)).
func (c *torsionCage) legFor(torque float64) float64 {
	return torque / (2 * c.phi * c.flow * c.fyt * c.cot)
}

// pullFor is what the longitudinal steel of a section with At/s must pull with,
// Al fy: by 22.7.6.1(b), and at least by 9.6.4.3.
func (c *torsionCage) pullFor(leg float64) (strength, least float64) {
	return leg * c.perimeter * c.fyt * c.cot * c.cot, c.leastPull(leg)
}

// leastPull is Al,min fy of 9.6.4.3, the lesser of its two expressions: they
// differ in At/s, which the second does not take below 25 bw/fyt.
func (c *torsionCage) leastPull(leg float64) float64 {
	return max(0, c.pull-max(leg, c.least)*c.perimeter*c.fyt)
}

// torsionYield is fy of longitudinal steel as it may be used in torsion.
func (e *edition) torsionYield(yield units.Stress) float64 {
	return min(e.stressIn(yield), e.materials.mostTorsionYield)
}

// sideParts is into how many parts the bars along a side divide it, where they
// are just no further apart than 9.7.5.1 allows: one where the corners suffice.
func (c *torsionCage) sideParts(e *edition) float64 {
	return max(1, math.Ceil(c.y1/e.torsion.around*(1-noLength)))
}

// faceShare is the part of the longitudinal steel that lies at the top and at
// the bottom each, and sideShare that along each side. Steel is spread evenly
// over the perimeter of the stirrup, and each bar takes what is nearest to it,
// so that the bars in the corners take half a part of each side. The sum of
// both, twice, is the whole.
func (c *torsionCage) faceShare(e *edition) float64 {
	return (c.x1 + c.y1/c.sideParts(e)) / c.perimeter
}

func (c *torsionCage) sideShare(e *edition) float64 {
	return c.y1 * (1 - 1/c.sideParts(e)) / c.perimeter
}
