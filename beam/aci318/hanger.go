package aci318

import (
	"math"

	"soffit.example/beam"
	"soffit.example/units"
)

// A load that hangs below the top of the beam is lifted by stirrups, beside
// what they do in shear (R9.4.3.2, which gives no rule). These are judgements:
// the stirrups within the length of the load carry it, or within h/2 on each
// side of a point load, and what is left of them carries the shear.

// hungLength is the length of beam, from face to face at most, whose stirrups
// lift a point load.
func hungLength(p *beam.Problem, span int, at units.Length) (from, to units.Length, ok bool) {
	left, right := p.Faces(span)
	if at.Less(left) || right.Less(at) {
		return from, to, false // it acts on the support
	}
	half := p.Brief.Section.Depth.Scale(0.5)
	return at.Sub(half).Max(left), at.Add(half).Min(right), true
}

// hung reports whether a load hangs on a span and pulls along it.
func hung(l *beam.Load, span int) bool {
	if !l.Hung || l.Span != 0 && l.Span != span {
		return false
	}
	return l.Shape == beam.Uniform || l.Shape == beam.Partial || l.Shape == beam.PointLoad
}

// hungLoad is the factored load for each length of the beam that hangs at a
// place under a combination, in N/m. Where loads begin or end the greater side
// counts; a load that presses from below relieves nothing.
func hungLoad(p *beam.Problem, span int, combination string, at units.Length) float64 {
	sum := 0.0
	for i := range p.Brief.Loads {
		l := &p.Brief.Loads[i]
		if !hung(l, span) {
			continue
		}
		w := l.Intensity.In(units.NewtonPerMetre)
		switch l.Shape {
		case beam.Partial:
			if at.Less(l.From) || l.To.Less(at) {
				continue
			}
			if l.Varies {
				share := at.Sub(l.From).Ratio(l.To.Sub(l.From))
				w += share * (l.IntensityEnd.In(units.NewtonPerMetre) - w)
			}
		case beam.PointLoad:
			from, to, ok := hungLength(p, span, l.At)
			if !ok || at.Less(from) || to.Less(at) {
				continue
			}
			w = l.Force.In(units.Newton) / to.Sub(from).In(units.Metre)
		}
		sum += max(0, w*factorOf(p, combination, l.Case))
	}
	return sum
}

// factorOf is the factor of a load case in a combination.
func factorOf(p *beam.Problem, combination string, c beam.LoadCase) float64 {
	for i := range p.Kept {
		if p.Kept[i].ID != combination {
			continue
		}
		for _, f := range p.Kept[i].Factors {
			if f.Case == c {
				return f.Factor
			}
		}
	}
	return 0
}

// hangerSteel is the stirrup steel that a section needs for each length, in
// the units of the edition.
type hangerSteel struct {
	load     float64 // hung, force for each length
	lift     float64 // Av/s that lifts it
	shear    float64 // Av/s that shear needs
	provided float64 // Av/s that counts
}

// lifting finds what hangs at a section and what its stirrups must be.
func (w *webSteel) lifting(e *edition, s *sectionShear, load float64) hangerSteel {
	h := hangerSteel{load: e.forceIn(units.Newton.Of(load)) / e.lengthIn(units.Metre.Of(1))}
	h.lift = h.load / (w.phi * w.fyt * w.slope.sin)
	h.shear = math.Max(0, s.needed-s.bent) / (w.fyt * w.slope.lever() * w.bare.d)
	if w.steel > 0 {
		h.provided = w.provided
	}
	return h
}

// hangerSection is the section found worst where a load hangs.
type hangerSection struct {
	worstSection
	steel hangerSteel
}

// lift judges the stirrups of a section where a load hangs.
func (z *webZone) lift(sense beam.Sense, web *webSteel, a *beam.Action, s *sectionShear, note string) {
	load := hungLoad(z.t.Problem, z.span, a.Combination, a.At)
	if load == 0 || web.bare.d == 0 {
		return
	}
	h := web.lifting(z.e, s, load)
	if u := ratio(h.lift+h.shear, h.provided); !z.hanger.found || u > z.hanger.utilization {
		z.hanger.take(u, sense, a, s, note)
		z.hanger.steel = h
	}
}

const noteHanger = "the stirrups lift what hangs here beside carrying the shear; a point load within half the depth on each side of it"

// appendHanger appends whether the stirrups of a stretch lift what hangs there.
func (z *webZone) appendHanger(dst []beam.Check) []beam.Check {
	if z.hanger == nil || !z.hanger.found {
		return dst
	}
	e, h := z.e, &z.hanger.steel
	c := beam.Check{ID: "hanger.stirrups", Clause: "R9.4.3.2", Reason: noteHanger}
	z.hanger.at(&c, z.span)
	c.Compare(e.steelOf(h.lift+h.shear).Amount(), e.steelOf(h.provided).Amount())
	if z.t.Record {
		c.Steps = z.hangerSteps()
	}
	return append(dst, c)
}

// hangerSteps is the working of the stirrups that lift a load.
func (z *webZone) hangerSteps() []beam.Step {
	e, h, w := z.e, &z.hanger.steel, &z.hanger.worstSection
	web := z.webFor(w.sense, w.action.Shear)
	var out working
	web.concreteSteps(e, &out, &w.values)
	bent := ""
	if w.values.bent > 0 {
		bentSteps(e, &out, web, z.bentGroups(w), w.values.bent)
		bent = " - Vb"
	}
	web.stirrupSteps(e, &out)
	lift, shear := "φ fyt", "fyt d"
	if !web.slope.upright() {
		lift, shear = "φ fyt sinα", "fyt (sinα + cosα) d"
	}
	// Load for each length as a force: what hangs on one unit of length.
	out.given("Wu", "factored load that hangs on one "+e.length.String()+" of the beam", "R9.4.3.2", e.asForce(h.load))
	out.given("ℓ", "that length", "", e.asLength(1))
	out.find("av,h", "stirrup area per length that lifts it", "R9.4.3.2", "Wu / (ℓ "+lift+")", e.asSteel(h.lift))
	out.find("av,v", "stirrup area per length that shear needs", e.stirrups.requiredClause,
		"max(Vu / φ - Vc"+bent+", 0) / ("+shear+")", e.asSteel(h.shear))
	out.find("av,req", "stirrup area per length required", "R9.4.3.2", "av,h + av,v", e.asSteel(h.lift+h.shear))
	if h.provided > 0 {
		out.find("av", "stirrup area provided per length", "", "Av / s", e.asSteel(h.provided))
	}
	return out.steps
}

// addPlaces appends the places where what hangs on a span, or what bent bars
// carry, begins or ends, beside those where loads do.
func (e *edition) addPlaces(places []units.Length, t *beam.Trial, span int) []units.Length {
	for i := range t.Brief.Loads {
		if l := &t.Brief.Loads[i]; hung(l, span) && l.Shape == beam.PointLoad {
			if from, to, ok := hungLength(t.Problem, span, l.At); ok {
				places = append(places, from, to)
			}
		}
	}
	for i := range t.Bent {
		if t.Bent[i].Span == span {
			from, to := e.bentReach(t, i)
			places = append(places, from, to)
		}
	}
	return places
}

// appendHung names what a load or a support that hangs asks for beside the
// stirrups that lift it.
func appendHung(dst []beam.Check, b *beam.Brief) []beam.Check {
	for i := range b.Supports {
		if b.Supports[i].Hung {
			dst = append(dst, notJudgedHanger)
			break
		}
	}
	for i := range b.Loads {
		if b.Loads[i].Hung {
			return append(dst, notJudgedLedge)
		}
	}
	return dst
}

var notJudgedHanger = beam.NotJudgedCheck("shear.hanger-steel", "R9.4.3.2",
	"a support pulls on the end of the beam: the steel that hands the reaction over, and that of the member it hangs from, are not designed by this version")

var notJudgedLedge = beam.NotJudgedCheck("hanger.ledge", "16.5",
	"a load hangs on the beam: the ledge or the insert that brings it to the stirrups, and their anchorage round it, are not judged by this version")
