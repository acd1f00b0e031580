package aci318

import (
	"fmt"
	"strings"

	"soffit.example/bars"
	"soffit.example/beam"
)

// Settle holds what the expressions assumed against the finished beam.
func (c Code) Settle(t *beam.Trial, checks []beam.Check, note *beam.Register) {
	c.e.settleTensionControl(t, note)
	c.e.settleSteel(t, note)
	c.e.settleLeastStirrups(t, note)
	c.e.settleSlopes(t, note)
	c.e.settleCover(t, note)
	c.e.settleTorsion(t, note)
}

// settleCover lists a cover that the brief itself sets below the table's.
func (e *edition) settleCover(t *beam.Trial, note *beam.Register) {
	if !e.ownCover(t) {
		return
	}
	least := e.leastCover(t.Brief.Exposure, &bars.Size{})
	note.Assume(beam.Assumption{
		ID: "cover.below-table",
		Assumed: fmt.Sprintf("a cover of %s is permitted here, though %s asks %s of %s exposure",
			e.length.Format(t.Brief.Cover), e.cover.clause, e.length.Format(least), t.Brief.Exposure),
		UsedIn: []string{"cover.stirrup", "cover.bar"},
		Open:   true,
	})
}

// settleTensionControl gives the class of each sense that is bent. φ follows
// the class that was found, so that a transition is no fault in itself.
func (e *edition) settleTensionControl(t *beam.Trial, note *beam.Register) {
	var found []string
	holds := true
	for s := beam.Positive; s <= beam.Negative; s++ {
		if _, bent := greatestAction(t.Problem, s); !bent {
			continue
		}
		f, ok := e.trialFlexure(t, s)
		if !ok {
			continue
		}
		need := e.reduction.tensionStrain(f.yieldStrain)
		found = append(found, fmt.Sprintf("%s bending: the extreme layer, at dt = %s (d = %s to the centroid), has a strain of %.5f against %.5f: %s, φ = %.3f",
			s, e.length.Format(f.extreme), e.length.Format(tensionSteel(t, s).depth), f.strain, need, f.class, f.phi))
		holds = holds && f.class == tensionControlled
	}
	if len(found) == 0 {
		note.Settle(assumeTensionControl, "nothing is bent", true)
		return
	}
	note.Settle(assumeTensionControl, strings.Join(found, "; "), holds)
}

// settleSteel lists the readings that only some layouts call for: of steel of
// several grades, and of bars beyond the spread of 24.3.4.
func (e *edition) settleSteel(t *beam.Trial, note *beam.Register) {
	grades, beyond := false, false
	for s := beam.Positive; s <= beam.Negative; s++ {
		if bendsAnywhere(t, s) && t.Steel(s.TensionFace()).Count > 0 {
			beyond = beyond || beyondSpread(t, s)
			grades = grades || !oneYield(e.trialSection(t, s))
		}
	}
	read := func(id, assumed string, usedIn ...string) {
		note.Assume(beam.Assumption{ID: id, Assumed: assumed, UsedIn: append(usedIn, flexureChecks...), Found: "a choice of reading: it holds as taken", Holds: true})
	}
	const positive, negative = "flexure.strain.positive", "flexure.strain.negative"
	if grades {
		read("reading.grades", noteGrades, positive, negative, "flexure.minimum.positive", "flexure.minimum.negative")
	}
	if beyond {
		read("reading.flange-spread", "bars farther out in the flange than 24.3.4 spreads the tension steel count neither in strength nor as least steel, but lower the strain that is held against 9.3.3.1",
			positive, negative, "flexure.minimum.positive", "flexure.minimum.negative", "shear.strength")
	}
}

// settleLeastStirrups compares the stirrups of every zone with the least that
// lets rows (a) and (b) be used. Where they fall short row (c) was used, so
// that the shear checks stand either way.
func (e *edition) settleLeastStirrups(t *beam.Trial, note *beam.Register) {
	if len(t.Zones) == 0 {
		note.Settle(assumeLeastStirrups, "there are no stirrups: Vc is by row (c)", false)
		return
	}
	holds, worst := true, 0.0
	for i := range t.Zones {
		z := e.newWebZone(t, t.Zones[i].Span, i, t.Zones[i].Spacing)
		w := &z.web[senseIndex(beam.Positive)]
		if t.EffectiveDepth(beam.Positive).IsZero() {
			w = &z.web[senseIndex(beam.Negative)]
		}
		holds = holds && w.enough
		if share := ratio(w.least, w.provided); share > worst {
			worst = share
		}
	}
	found := fmt.Sprintf("every zone has at least the least stirrups, of which %.2f of those provided are needed where they are fewest", worst)
	if !holds {
		found = "a zone has fewer or wider stirrups: Vc there is by row (c)"
	}
	note.Settle(assumeLeastStirrups, found, holds)
}
