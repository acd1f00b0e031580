package aci318

import (
	"fmt"

	"soffit.example/beam"
	"soffit.example/units"
)

// torsionChecks are those that rest on how a torque is taken.
var torsionChecks = []string{"torsion.section", "torsion.transverse", "torsion.longitudinal.bottom", "torsion.longitudinal.top", "torsion.longitudinal.side"}

// torsion fills what the brief leaves open of its torques.
func (r *resolution) torsion() {
	b := r.b
	if fault, wrong := angleFault(b.Readings.TorsionAngle); wrong {
		r.faults = append(r.faults, fault)
	}
	unstated := false
	state := func(torque units.Moment, path *beam.TorquePath) {
		if *path == 0 && !torque.IsZero() {
			*path, unstated = beam.EquilibriumTorque, true
		}
	}
	for i := range b.Loads {
		if l := &b.Loads[i]; l.Shape == beam.Torque || l.Shape == beam.UniformTorque {
			state(l.Moment, &l.Path)
		}
	}
	for i := range b.Demands {
		state(b.Demands[i].Torque, &b.Demands[i].Path)
	}
	if unstated {
		r.confirm("torsion.path", "torques whose path is not stated are needed for equilibrium: none of them is shed (22.7.3.1)", torsionChecks...)
	}
}

// settleTorsion lists how a torque was taken.
func (e *edition) settleTorsion(t *beam.Trial, note *beam.Register) {
	holds := func(id, assumed string) {
		note.Assume(beam.Assumption{ID: id, Assumed: assumed, UsedIn: torsionChecks, Found: "a choice of reading: it holds as taken", Holds: true})
	}
	if torqueActs(&t.Forces) && e.problemTorsion(t.Problem).cut {
		holds("reading.torsion-outline", "an overhang of the outline that is thinner than half the depth where it joins the web counts in Acp and pcp as a flange (9.2.4.4), a thicker one as a part of the web")
	}
	if !t.Twisted {
		return
	}
	angle := t.Brief.Readings.TorsionAngle
	if angle == 0 {
		angle = usualDiagonal
	}
	holds("reading.torsion-angle", "the compression diagonals of the space truss stand at "+number(angle)+" degrees to the axis (22.7.6.1.2)")
	holds("reading.torsion-shares", "the longitudinal steel of torsion is spread evenly over the perimeter of the stirrups, each bar taking what is nearest to it, with bars along the sides no closer than 9.7.5.1 asks for")
	if len(t.Forces.Demands()) == 0 {
		holds("reading.torsion-extent", "stirrups that the torque at a section needs go on for bt + d beyond it, besides those that the shear needs there; torques between a support and the section at d from its face, and torques that are neglected, count as they do at their own section (9.7.6.3.2, 9.4.4.3)")
	}
	if e.shear.rowsByStirrups {
		holds("reading.torsion-shear-row", "stirrups of at least "+e.stirrups.leastClause+" let Vc be by row (a) or (b) of Table 22.5.5.1 although torsion takes a part of them")
	}
	note.Assume(beam.Assumption{
		ID: "torsion.stirrup-hooks", UsedIn: []string{"torsion.closed"}, Open: true,
		Assumed: "closed stirrups end in 135-degree hooks round a bar, or in 90-degree ones only where a flange or slab keeps the concrete from spalling (25.7.1.6)",
	})
	if a, shed := e.mostShed(t.Problem); shed > 0 {
		where := ""
		if a.Span > 0 {
			where = fmt.Sprintf(", at %s in span %d", beam.Short(e.system, a.At.Amount()), a.Span)
		}
		note.Assume(beam.Assumption{
			ID: "torsion.redistribution", UsedIn: torsionChecks, Open: true,
			Assumed: "the neighbours are designed for the torque that this beam sheds by 22.7.3.2, in equilibrium with what it keeps (22.7.3.3)",
			Found:   beam.Short(e.system, e.momentOf(shed).Amount()) + " at most" + where + named(a.Combination),
		})
	}
}

// mostShed is the greatest part of a torque that is left to the neighbours.
func (e *edition) mostShed(p *beam.Problem) (worst beam.Action, shed float64) {
	s := e.problemTorsion(p)
	take := func(a beam.Action) {
		if q := s.torque(e, &a); q.shed > shed {
			worst, shed = a, q.shed
		}
	}
	for span := 1; span <= p.Forces.Spans(); span++ {
		left, right := p.Faces(span)
		eachTorque(&p.Forces, span, left, right, take)
	}
	for _, d := range p.Forces.Demands() {
		s.load(e, d.Axial)
		take(d)
	}
	return worst, shed
}
