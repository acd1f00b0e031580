package rederive

import (
	"math"

	"soffit.example/units"
)

// printed are the coefficients of one edition, in its own units.
type printed struct {
	us  bool
	y19 bool

	beta1Full, beta1Least, beta1Step float64
	es                               float64
	grade60                          float64
	fyMost, fytMost                  float64
	fcLeast, fyLeast                 float64
	rootMost                         float64
	asRoot, asFloor, asCap           float64 // 9.6.1.2
	vc, v8                           float64 // 22.5.5.1, 22.5.1.2
	det19, detRho, detMost           float64 // detailed expression of 318-14
	pushed, pulled                   float64 // 22.5.6.1, 22.5.7.1 of 318-14
	row, vcMost, trig, size          float64 // 318-19
	heavy                            float64 // 4√f'c
	avRoot, avFloor                  float64 // 9.6.3.3 -> 9.6.3.4
	sMost, sMostHeavy                float64
	shallow                          float64
	gap                              float64 // 25.2.1
	crack15, crack12, crackStress    float64
	deep                             float64 // 9.7.2.3
	coverIn, coverOut, coverOut6     float64
	coverGround                      float64
	tieGap                           float64 // 6 in of 25.7.2.3
	tth, tcr, tAxial                 float64 // 22.7.4.1, 22.7.5.1
	al, alFloor                      float64 // 9.6.4.3
	thin, round                      float64 // 9.7.5: least bar, greatest spacing round the perimeter
	sTwist                           float64 // 9.7.6.3.3
	split                            float64 // fct/√f'c of λ = 1
	shallowT, fcFibre                float64 // 9.6.3.1
	single                           float64 // 3√f'c of single bent bars
	rib, ribClear, ribSlab, ribFill  float64 // 9.8
	bundleCover                      float64 // 2 in of 20.5.1.3.5
	hook, hookYield                  float64 // 25.7.1.3
	density, aggregate               float64 // taken where the brief is silent
	light, lightSlope, lightMost     float64 // 9.3.1.1.2
	lightLow, lightHigh              float64
	depthFy                          float64 // 9.3.1.1.1
	lambdaLow, lambdaHigh, lambdaBy  float64
}

var inch = printed{
	us:        true,
	beta1Full: 4000, beta1Least: 8000, beta1Step: 1000,
	es: 29e6, grade60: 60000, fytMost: 60000, fcLeast: 2500, fyLeast: 40000, rootMost: 100,
	asRoot: 3, asFloor: 200, vc: 2, v8: 8,
	det19: 1.9, detRho: 2500, detMost: 3.5, pushed: 2000, pulled: 500,
	row: 8, vcMost: 5, trig: 1, size: 1.0 / 10,
	heavy: 4, avRoot: 0.75, avFloor: 50, sMost: 24, sMostHeavy: 12, shallow: 10,
	gap: 1, crack15: 15, crack12: 12, crackStress: 40000, deep: 36,
	coverIn: 1.5, coverOut: 1.5, coverOut6: 2, coverGround: 3, tieGap: 6,
	tth: 1, tcr: 4, tAxial: 4, al: 5, alFloor: 25, thin: 0.375, round: 12, sTwist: 12,
	split: 6.7, shallowT: 24, fcFibre: 6000, single: 3, rib: 4, ribClear: 30, ribSlab: 2, ribFill: 1.5, bundleCover: 2,
	hook: 0.014, hookYield: 40000, density: 150, aggregate: 0.75,
	light: 1.65, lightSlope: 0.005, lightMost: 1.09, lightLow: 90, lightHigh: 115, depthFy: 100000,
	lambdaLow: 100, lambdaHigh: 135, lambdaBy: 0.0075,
}

var metric = printed{
	beta1Full: 28, beta1Least: 55, beta1Step: 7,
	es: 200000, grade60: 420, fytMost: 420, fcLeast: 17, fyLeast: 280, rootMost: 8.3,
	asRoot: 0.25, asFloor: 1.4, vc: 0.17, v8: 0.66,
	det19: 0.16, detRho: 17, detMost: 0.29, pushed: 14, pulled: 3.5,
	row: 0.66, vcMost: 0.42, trig: 0.083, size: 0.004,
	heavy: 0.33, avRoot: 0.062, avFloor: 0.35, sMost: 600, sMostHeavy: 300, shallow: 250,
	gap: 25, crack15: 380, crack12: 300, crackStress: 280, deep: 900,
	coverIn: 40, coverOut: 40, coverOut6: 50, coverGround: 75, tieGap: 150,
	tth: 0.083, tcr: 0.33, tAxial: 0.33, al: 0.42, alFloor: 0.175, thin: 10, round: 300, sTwist: 300,
	split: 0.56, shallowT: 600, fcFibre: 40, single: 0.25, rib: 100, ribClear: 750, ribSlab: 50, ribFill: 40, bundleCover: 50,
	hook: 0.17, hookYield: 280, density: 2450, aggregate: 20,
	light: 1.65, lightSlope: 0.0003, lightMost: 1.09, lightLow: 1440, lightHigh: 1840, depthFy: 700,
	lambdaLow: 1600, lambdaHigh: 2160, lambdaBy: 0.00047,
}

// edition returns the coefficients of a code by its id.
func edition(id string) (printed, bool) {
	var p printed
	switch id {
	case "ACI 318-14", "ACI 318-19":
		p = inch
		p.fyMost = 80000
	case "ACI 318M-14", "ACI 318M-19":
		p = metric
		p.fyMost = 550
	default:
		return p, false
	}
	if id[len(id)-2:] == "19" {
		p.y19 = true
		p.asCap = p.fyMost
		p.fyMost = 100000
		if !p.us {
			p.fyMost = 690
		}
	}
	return p, true
}

// beta1 is Table 22.2.2.4.3.
func (p *printed) beta1(fc float64) float64 {
	if fc <= p.beta1Full {
		return 0.85
	}
	if fc >= p.beta1Least {
		return 0.65
	}
	return 0.85 - 0.05*(fc-p.beta1Full)/p.beta1Step
}

func (p *printed) yieldStrain(fy float64, rounded bool) float64 {
	if rounded && math.Abs(fy-p.grade60) < 1e-6*fy {
		return 0.002
	}
	return fy / p.es
}

// strains gives the strain of tension control and the least strain of a beam.
func (p *printed) strains(ety float64) (controlled, least float64) {
	if p.y19 {
		return ety + 0.003, ety + 0.003
	}
	return 0.005, 0.004
}

// phi is Table 21.2.2.
func (p *printed) phi(et, ety float64) float64 {
	full, _ := p.strains(ety)
	return math.Max(0.65, math.Min(0.90, 0.65+0.25*(et-ety)/(full-ety)))
}

// Plain numbers of quantities.
func (p *printed) length(l units.Length) float64 {
	if p.us {
		return l.In(units.Inch)
	}
	return l.In(units.Millimetre)
}

func (p *printed) area(a units.Area) float64 {
	if p.us {
		return a.In(units.SquareInch)
	}
	return a.In(units.SquareMillimetre)
}

func (p *printed) stress(s units.Stress) float64 {
	if p.us {
		return s.In(units.PSI)
	}
	return s.In(units.Megapascal)
}

func (p *printed) force(f units.Force) float64 {
	if p.us {
		return f.In(units.PoundForce)
	}
	return f.In(units.Newton)
}

func (p *printed) moment(m units.Moment) float64 {
	if p.us {
		return m.In(units.PoundInch)
	}
	return m.In(units.NewtonMillimetre)
}

func (p *printed) intensity(w units.LineLoad) float64 {
	if p.us {
		return w.In(units.PoundPerFoot) / 12
	}
	return w.In(units.NewtonPerMetre) / 1000
}

func (p *printed) unitWeight(d units.Density) float64 {
	if p.us {
		return d.In(units.PoundPerCubicFoot)
	}
	return d.In(units.KilogramPerCubicMetre)
}

// ownWeight is the line load of a section of an area, given its density.
func (p *printed) ownWeight(density, area float64) float64 {
	if p.us {
		return density * area / 1728
	}
	return density * 9.80665 * area * 1e-9
}

// number is that of a bar: eighths of an inch.
func (p *printed) number(db float64) int {
	if !p.us {
		db /= 25.4
	}
	return int(math.Round(8 * db))
}
