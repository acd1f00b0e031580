package aci318

import (
	"fmt"

	"soffit.example/beam"
)

// shearReadings lists what shear takes for granted of the concrete, of the floor
// and of the loads.
func (r *resolution) shearReadings() {
	b := r.b
	s, c := &b.Section, &b.Concrete
	if light := r.lightness(c); light.route != "" {
		r.assume("reading.lightweight", fmt.Sprintf("λ = %.4g %s (%s)", light.factor, light.route, light.clause)+r.otherRoutes(c),
			"shear.strength", "torsion.threshold")
	}
	if !c.Splitting.IsZero() && r.materials.splitting > 0 {
		r.confirm("concrete.splitting", "the splitting tensile strength was measured on concrete of the mixture with an average compressive strength of "+
			r.stress.Format(c.Strength), "shear.strength")
	}
	if c.Fibres {
		used := "; they are of no account in lightweight concrete"
		if !isLight(c.Kind) {
			used = ""
		}
		r.confirm("concrete.fibres", "the steel fibres, and their amount, are those that Table 9.6.3.1 asks for; they count for nothing else"+used, "shear.minimum-stirrups")
	}
	medium := r.lengthOf(r.stirrups.medium)
	if castWithSlab(s) && s.Slab.IsZero() && s.Depth.AtMost(medium) {
		r.confirm("section.integral-slab", "the flange is that of a slab that the beam is cast with (Table 9.6.3.1)", "shear.minimum-stirrups")
	}
	if s.Joist {
		r.confirm("section.joist", "the floor is one of joists by 9.8: evenly spaced ribs and a slab in one piece, no more than "+
			r.length.Format(r.lengthOf(r.joist.mostClear))+" clear between ribs, bars that run through (9.8.1.6) and steel across the ribs in the slab (9.8.1.7)",
			"shear.strength", "shear.minimum-stirrups", "joist.spacing", "joist.slab")
		r.assume("reading.joist-rib", "the depth of a rib, limited to 3.5 times its least width, is that below the slab; the slab is at least that over fillers which are not structural (9.8.3)",
			"joist.rib-depth", "joist.slab")
	}
	for i := range b.Loads {
		if b.Loads[i].Hung {
			r.assume("reading.hanger", "a load that hangs is lifted by the stirrups within its length, of a point load within half the depth on each side, with what they have left over from shear",
				"hanger.stirrups")
			break
		}
	}
}

// otherRoutes says which other value of the concrete was not gone by.
func (r *resolution) otherRoutes(c *beam.Concrete) string {
	switch {
	case r.materials.splitting == 0 && !c.Splitting.IsZero():
		return "; this edition does not go by the splitting tensile strength"
	case !r.materials.lightweightByComposition && (c.Kind == beam.FineBlend || c.Kind == beam.CoarseBlend):
		return "; the density, which may be gone by instead, is not used"
	case !r.materials.lightweightByComposition:
		return "; the composition, which may be gone by instead, is not used"
	}
	return ""
}

// directSupport is what 9.4.3.2 takes for granted where nothing is said to hang.
func directSupport(b *beam.Brief) string {
	const words = "supports press on the soffit and loads act at or near the top (9.4.3.2), as none is said to hang"
	if b.Section.Shape == beam.InvertedTee {
		return words + ", though the beam has ledges"
	}
	return words
}

// settleSlopes lists how stirrups that lean and bent bars were counted.
func (e *edition) settleSlopes(t *beam.Trial, note *beam.Register) {
	assume := func(id, assumed string) {
		note.Assume(beam.Assumption{
			ID: id, Assumed: assumed, UsedIn: []string{"shear.strength"}, Found: "a choice of reading: it holds as taken", Holds: true,
		})
	}
	for i := range t.Zones {
		if s := slopeOf(t.Zones[i].Angle); !s.upright() {
			assume("reading.inclined-stirrups", "stirrups that lean do so against the greatest shear of their zone, and do not count where shear acts the other way")
			break
		}
	}
	if len(t.Bent) == 0 {
		return
	}
	assume("reading.bent-bars", "bent bars run from the level of the first layer at one face to that at the other, and count for strength in shear alone, "+
		"at sections that cut the central three quarters of their slope and under shear that they rise against; single groups together carry no more than "+
		number(e.stirrups.bentMost)+" √f'c bw d; least stirrups are asked for as without them")
	if used, capped := e.shearYield(t.Brief.Reinforcement.Yield); capped {
		assume("reinforcement.bent-yield-cap", "bent bars count in shear with "+e.stress.Format(used)+" of their "+
			e.stress.Format(t.Brief.Reinforcement.Yield)+" ("+e.materials.yieldClause+")")
	}
	note.Assume(beam.Assumption{
		ID: "bent-bars.anchorage", Assumed: "bent bars are developed beyond both ends of their slope", UsedIn: []string{"shear.strength"}, Open: true,
	})
}
