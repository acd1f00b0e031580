package aci318

import (
	"math"

	"soffit.example/beam"
	"soffit.example/units"
)

// shearRules are the coefficients of the concrete's one-way shear strength
// (22.5.5 to 22.5.7) and of the section limit (22.5.1.2), in the units of an
// edition.
type shearRules struct {
	plain   float64 // of λ√f'c: the simplified expression, and row (a) of 318-19
	section float64 // of √f'c, what the section may carry over Vc, 22.5.1.2

	// 318-14: Table 22.5.5.1, and 22.5.6.1 and 22.5.7.1 under axial force.
	detailed    float64 // of λ√f'c in rows (a) and (b)
	perRatio    float64 // of ρw Vu d/Mu, and of ρw
	greatest    float64 // of λ√f'c in row (c)
	compression float64 // stress: 1 + Nu/(2000 Ag)
	tension     float64 // stress: 1 + Nu/(500 Ag)

	// 318-19: Table 22.5.5.1. The row depends on the stirrups provided.
	rowsByStirrups bool
	byRatio        float64 // of λ ρw^(1/3) √f'c in rows (b) and (c)
	most           float64 // of λ√f'c, 22.5.5.1.1
	axial          float64 // Nu/(6 Ag)
	axialMost      float64 // of f'c, 22.5.5.1.2
	sizeDepth      float64 // d at which 1 + d/10 doubles, 22.5.5.1.3
}

var (
	shear14US = shearRules{
		plain: 2, section: 8,
		detailed: 1.9, perRatio: 2500, greatest: 3.5, compression: 2000, tension: 500,
	}
	shear14SI = shearRules{
		plain: 0.17, section: 0.66,
		detailed: 0.16, perRatio: 17, greatest: 0.29, compression: 14, tension: 3.5,
	}
	shear19US = shearRules{
		plain: 2, section: 8,
		rowsByStirrups: true, byRatio: 8, most: 5, axial: 6, axialMost: 0.05, sizeDepth: 10,
	}
	shear19SI = shearRules{
		plain: 0.17, section: 0.66,
		rowsByStirrups: true, byRatio: 0.66, most: 0.42, axial: 6, axialMost: 0.05, sizeDepth: 250,
	}
)

// concreteRow names the expression that gave Vc.
type concreteRow uint8

const (
	rowSimplified  concreteRow = iota + 1 // 318-14, 22.5.5.1
	rowDetailedA                          // 318-14, Table 22.5.5.1
	rowDetailedB                          //
	rowDetailedC                          //
	rowCompression                        // 318-14, 22.5.6.1
	rowTension                            // 318-14, 22.5.7.1
	rowA                                  // 318-19, Table 22.5.5.1
	rowB                                  //
	rowC                                  //
	rowMost                               // 318-19, 22.5.5.1.1
	rowNone                               // 318-19 and 22.5.7.1: tension leaves nothing
)

// String is the name of the row as a result gives it.
func (r concreteRow) String() string {
	switch r {
	case rowSimplified:
		return "simplified"
	case rowDetailedA:
		return "detailed a"
	case rowDetailedB:
		return "detailed b"
	case rowDetailedC:
		return "detailed c"
	case rowCompression:
		return "axial compression"
	case rowTension:
		return "axial tension"
	case rowA:
		return "a"
	case rowB:
		return "b"
	case rowC:
		return "c"
	case rowMost:
		return "cap"
	case rowNone:
		return "none"
	}
	return ""
}

// clause is where the row is printed.
func (r concreteRow) clause() string {
	switch r {
	case rowSimplified:
		return "22.5.5.1"
	case rowDetailedA, rowA:
		return "Table 22.5.5.1(a)"
	case rowDetailedB, rowB:
		return "Table 22.5.5.1(b)"
	case rowDetailedC, rowC:
		return "Table 22.5.5.1(c)"
	case rowCompression:
		return "22.5.6.1"
	case rowTension:
		return "22.5.7.1"
	case rowMost, rowNone:
		return "22.5.5.1.1"
	}
	return ""
}

// shearSection is a section as 22.5 sees it, apart from the forces on it. All
// of it belongs to one sense of bending: depth is that of the centroid of the
// steel in flexural tension, area the area of that steel.
type shearSection struct {
	strength units.Stress
	light    lightness
	width    units.Length // bw, the least width of the web net of hollows
	height   units.Length // h, overall
	gross    units.Area   // Ag, net of hollows
	depth    units.Length // d
	area     units.Area   // As
	stirrups stirrupSteel
	row      beam.ShearRow
	method   beam.ShearMethod

	// What the exemptions of Table 9.6.3.1 go by, and 9.8.1.5.
	slab   units.Length // thickness of the slab it is cast with; zero: none
	fibres bool         // steel-fibre normalweight concrete
	joist  bool         // a rib of a joist floor within the limits of 9.8.1
}

// shearSection is a section but for what the sense of bending and the stirrups
// decide.
func (e *edition) shearSection(s *beam.Section, g *beam.Geometry, c *beam.Concrete, r *beam.Readings) shearSection {
	out := shearSection{
		strength: c.Strength, light: e.lightness(c),
		width: g.Web, height: s.Depth, gross: g.Gross, row: r.ShearRow, method: r.ShearMethod,
		fibres: c.Fibres && !isLight(c.Kind), joist: s.Joist && e.joistRib(s, g).sound(e),
	}
	if castWithSlab(s) {
		out.slab = s.FlangeThickness
	}
	return out
}

// shearForces act together on a section, with what bent bars carry there.
// Signs of shear and moment do not matter; axial compression is positive.
type shearForces struct {
	shear  units.Force
	moment units.Moment
	axial  units.Force
	bent   bentShare
}

// webShear is a section made ready for any forces: everything in 22.5 that
// does not depend on them, in the units of the edition.
type webShear struct {
	shearSection
	fc, bw, h, d, as float64
	ag               float64
	root, rootUsed   float64 // √f'c, and as 22.5.3.1 lets Vc use it
	ratio            float64 // ρw
	cube             float64 // ρw^(1/3)
	size             float64 // λs
	web              float64 // bw d
}

// newWebShear prepares a section, with the cap on √f'c of 22.5.3.1.
func (e *edition) newWebShear(s *shearSection) webShear {
	r := &e.shear
	w := webShear{
		shearSection: *s,
		fc:           e.stressIn(s.strength),
		bw:           e.lengthIn(s.width), h: e.lengthIn(s.height), d: e.lengthIn(s.depth),
		as: e.areaIn(s.area), ag: e.areaIn(s.gross),
	}
	w.root = math.Sqrt(w.fc)
	w.rootUsed = min(w.root, e.materials.rootCap)
	w.web = w.bw * w.d
	if w.web > 0 {
		w.ratio = w.as / w.web
	}
	if r.rowsByStirrups {
		w.cube = math.Cbrt(w.ratio)
		w.size = min(1, math.Sqrt(2/(1+w.d/r.sizeDepth)))
	}
	return w
}

// concreteShear is Vc with every value on the way, in the units of the
// edition. Expressions that were not needed are zero.
type concreteShear struct {
	row         concreteRow
	rootCapped  bool
	axial       float64 // Nu
	axialTerm   float64 // 318-19: Nu/(6 Ag) as used; 318-14: the factor on Vc
	axialCapped bool
	a, b, c     float64 // by the rows of Table 22.5.5.1
	most        float64 // 318-19: the cap of 22.5.5.1.1
	ordinary    float64 // Vc but for the 1.1 of joists, 9.8.1.5
	strength    float64 // Vc
}

// concrete is Vc under forces given in the units of the edition; enough says
// that the section has at least the least stirrups.
func (w *webShear) concrete(e *edition, shear, moment, axial float64, enough bool) concreteShear {
	c := concreteShear{axial: axial, rootCapped: w.rootUsed < w.root}
	if e.shear.rowsByStirrups {
		w.byRows(e, &c, enough)
	} else {
		w.byMethod(e, &c, math.Abs(shear), math.Abs(moment))
	}
	c.ordinary = c.strength
	if w.joist {
		c.strength *= joistShear
	}
	return c
}

// byRows is Table 22.5.5.1 of 318-19.
func (w *webShear) byRows(e *edition, c *concreteShear, enough bool) {
	r := &e.shear
	v := w.light.factor * w.rootUsed
	if c.axial != 0 {
		c.axialTerm = c.axial / (r.axial * w.ag)
		if most := r.axialMost * w.fc; c.axialTerm > most {
			c.axialTerm, c.axialCapped = most, true
		}
	}
	if enough {
		c.a = (r.plain*v + c.axialTerm) * w.web
		c.b = (r.byRatio*w.cube*v + c.axialTerm) * w.web
		c.row, c.strength = rowA, c.a
		if w.row == beam.RowB || w.row != beam.RowA && c.b > c.a {
			c.row, c.strength = rowB, c.b
		}
	} else {
		c.c = (r.byRatio*w.size*w.cube*v + c.axialTerm) * w.web
		c.row, c.strength = rowC, c.c
	}
	c.most = r.most * v * w.web
	if c.strength > c.most {
		c.row, c.strength = rowMost, c.most
	}
	if c.strength < 0 {
		c.row, c.strength = rowNone, 0
	}
}

// byMethod is 22.5.5.1, 22.5.6.1 and 22.5.7.1 of 318-14. Under axial force the
// simplified expressions are used whichever method was asked for.
func (w *webShear) byMethod(e *edition, c *concreteShear, shear, moment float64) {
	r := &e.shear
	v := w.light.factor * w.rootUsed
	switch {
	case c.axial > 0:
		c.axialTerm = 1 + c.axial/(r.compression*w.ag)
		c.row, c.strength = rowCompression, r.plain*c.axialTerm*v*w.web
	case c.axial < 0:
		c.axialTerm = 1 + c.axial/(r.tension*w.ag)
		c.row, c.strength = rowTension, r.plain*c.axialTerm*v*w.web
		if c.strength < 0 {
			c.row, c.strength = rowNone, 0
		}
	case w.method == beam.DetailedShear:
		c.b = (r.detailed*v + r.perRatio*w.ratio) * w.web
		c.c = r.greatest * v * w.web
		c.row, c.strength = rowDetailedB, c.b
		if c.c < c.b {
			c.row, c.strength = rowDetailedC, c.c
		}
		// Row (a) is below row (b) only where Vu d/Mu is below one; without a
		// moment it has no value.
		if shear*w.d < moment {
			c.a = (r.detailed*v + r.perRatio*w.ratio*shear*w.d/moment) * w.web
			if c.a < c.strength {
				c.row, c.strength = rowDetailedA, c.a
			}
		}
	default:
		c.row, c.strength = rowSimplified, r.plain*v*w.web
	}
}
