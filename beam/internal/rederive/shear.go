package rederive

import "math"

// web is a section as 22.5 sees it under one sense of bending, with stirrups.
type web struct {
	p                *printed
	fc, lambda       float64
	bw, h, d, as     float64
	ag               float64
	fyt              float64
	angle            float64 // of the stirrups, radians
	integral         float64 // greatest depth of a beam integral with a slab that is exempt; zero: none
	fibres           bool    // in place of least stirrups
	joist            bool
	bent             float64 // Vs of bent bars where the section is (22.5.8.6)
	av, s            float64 // no stirrups: zero
	across           float64 // widest distance between legs
	detailed         bool
	rowA, rowB       bool // asked for one of the rows
	phi              float64
	avMin            float64 // per length
	enough           bool
	root             float64
	rho              float64
	small            bool // exempt by its depth
	limitAlong       float64
	limitAlongHeavy  float64
	limitAcross      float64
	limitAcrossHeavy float64
}

func (w *web) prepare() {
	p := w.p
	w.phi = 0.75
	w.root = math.Sqrt(w.fc)
	w.avMin = math.Max(p.avRoot*w.root, p.avFloor) * w.bw / w.fyt
	w.enough = w.s > 0 && w.av/w.s >= w.avMin*(1-1e-9)
	w.rho = w.as / (w.bw * w.d)
	w.small = w.joist || w.h <= math.Max(p.shallow, w.integral)*(1+1e-9)
	w.limitAlong, w.limitAlongHeavy = math.Min(w.d/2, p.sMost), math.Min(w.d/4, p.sMostHeavy)
	w.limitAcross, w.limitAcrossHeavy = math.Min(w.d, p.sMost), math.Min(w.d/2, p.sMostHeavy)
}

// concrete is Vc, with stirrups counted as at least the least or not; of a
// joist by a tenth more (9.8.1.5).
func (w *web) concrete(v, m, nu float64, enough bool) float64 {
	vc := w.plain(v, m, nu, enough)
	if w.joist {
		vc *= 1.1
	}
	return vc
}

func (w *web) plain(v, m, nu float64, enough bool) float64 {
	p, bd := w.p, w.bw*w.d
	root := w.root
	if !enough {
		root = math.Min(root, p.rootMost)
	}
	lr := w.lambda * root
	ag := w.ag
	if p.y19 {
		axial := math.Min(nu/(6*ag), 0.05*w.fc)
		cube := math.Cbrt(w.rho)
		vc := 0.0
		if enough {
			a, b := p.vc*lr+axial, p.row*cube*lr+axial
			switch {
			case w.rowA:
				vc = a
			case w.rowB:
				vc = b
			default:
				vc = math.Max(a, b)
			}
		} else {
			size := math.Min(1, math.Sqrt(2/(1+p.size*w.d)))
			vc = p.row*size*cube*lr + axial
		}
		return math.Max(0, math.Min(vc, p.vcMost*lr)) * bd
	}
	switch {
	case nu > 0:
		return p.vc * (1 + nu/(p.pushed*ag)) * lr * bd
	case nu < 0:
		return math.Max(0, p.vc*(1+nu/(p.pulled*ag))*lr*bd)
	case !w.detailed:
		return p.vc * lr * bd
	}
	vc := math.Min(p.det19*lr+p.detRho*w.rho, p.detMost*lr)
	if m > 0 {
		vc = math.Min(vc, p.det19*lr+p.detRho*w.rho*v*w.d/m)
	}
	return vc * bd
}

// shearing is what one section asks and has.
type shearing struct {
	strength, limit, least, along, across float64 // utilizations; zero: not asked
}

// at judges a section under a shear, the moment acting with it and an axial
// force, compression positive. A section that needs no stirrups is none the
// worse for those it has.
func (w *web) at(v, m, nu float64) shearing {
	out := w.judge(v, m, nu)
	if w.s == 0 || out.most() <= 1+slack {
		return out
	}
	without := *w
	without.av, without.s = 0, 0
	without.prepare()
	if bare := without.judge(v, m, nu); bare.most() <= 1+slack {
		return bare
	}
	return out
}

// steel is Vs of stirrups (22.5.8.5).
func (w *web) steel() float64 {
	if w.angle != 0 && w.angle < math.Pi/2 {
		return w.av * w.fyt * (math.Sin(w.angle) + math.Cos(w.angle)) * w.d / w.s
	}
	return w.av * w.fyt * w.d / w.s
}

func (s shearing) most() float64 { return max(s.strength, s.limit, s.least, s.along, s.across) }

func (w *web) judge(v, m, nu float64) shearing {
	p, bd := w.p, w.bw*w.d
	v, m = math.Abs(v), math.Abs(m)
	if v == 0 {
		return shearing{}
	}
	vc := w.concrete(v, m, nu, w.enough)
	vs := 0.0
	if w.s > 0 {
		vs = w.steel()
	}
	vs += w.bent
	over := func(a, b float64) float64 {
		if b <= 0 {
			return math.Inf(1)
		}
		return a / b
	}
	out := shearing{strength: over(v, w.phi*(vc+vs)), limit: over(v, w.phi*(vc+p.v8*w.root*bd))}
	bare := w.concrete(v, m, nu, false)
	trigger := 0.5 * w.phi * bare
	if p.y19 {
		trigger = w.phi * p.trig * w.lambda * math.Min(w.root, p.rootMost) * bd
	}
	if w.small || w.fibres && w.h <= p.shallowT*(1+1e-9) && v <= w.phi*p.vc*w.root*bd*(1+1e-9) {
		trigger = math.Max(trigger, w.phi*bare)
	}
	required := v > trigger*(1+1e-6) || v > w.phi*vc*(1+1e-6)
	if !required {
		return out
	}
	if w.s == 0 {
		out.least = over(v, trigger)
		return out
	}
	if v > trigger*(1+1e-6) {
		out.least = w.avMin / (w.av / w.s)
	}
	needed := v/w.phi - vc // of stirrups and bent bars
	if needed > p.heavy*w.root*bd*(1+1e-6) {
		out.along, out.across = over(w.s, w.limitAlongHeavy), over(w.across, w.limitAcrossHeavy)
	} else {
		out.along, out.across = over(w.s, w.limitAlong), over(w.across, w.limitAcross)
	}
	if !p.y19 {
		out.across = 0
	}
	return out
}
