package aci318

import (
	"soffit.example/beam"
	"soffit.example/units"
)

// joistRules are the limits of one-way joist floors, 9.8.1 and 9.8.3, in the
// units of an edition.
type joistRules struct {
	leastRib  float64 // width, 9.8.1.2
	mostClear float64 // between ribs, 9.8.1.4
	leastSlab float64 // thickness over fillers that are not structural, 9.8.3.1
}

var (
	joistUS = joistRules{leastRib: 4, mostClear: 30, leastSlab: 2}
	joistSI = joistRules{leastRib: 100, mostClear: 750, leastSlab: 50}
)

const (
	joistShear     = 1.1 // on Vc, 9.8.1.5
	joistSlender   = 3.5 // depth of a rib over its least width, 9.8.1.3
	joistSlabShare = 12  // clear distance between ribs over the slab's thickness, 9.8.3.1
)

// joistRib is a rib of a joist floor, in the units of the edition. A rib hangs
// below the slab: its depth is that of the section without the flange.
type joistRib struct {
	width  float64 // least
	height float64 // h
	slab   float64 // thickness; zero: not known
	depth  float64 // h less the slab
	// clear is the greater clear distance to the next rib, if measured. If not,
	// it is at least this: a flange works with its web no further than half way
	// to the next one (6.3.2.1).
	clear    float64
	measured bool
}

func (e *edition) joistRib(s *beam.Section, g *beam.Geometry) joistRib {
	left, right := s.Overhangs(beam.Top)
	r := joistRib{width: e.lengthIn(g.Web), height: e.lengthIn(s.Depth), clear: 2 * e.lengthIn(left.Max(right))}
	if !s.Slab.IsZero() {
		r.clear, r.measured = e.lengthIn(s.Slab.ClearLeft.Max(s.Slab.ClearRight)), true
	}
	if s.Flange() == beam.Top {
		r.slab = e.lengthIn(s.FlangeThickness)
	}
	r.depth = r.height - r.slab
	return r
}

// leastSlab is the least thickness of the slab between the ribs.
func (r *joistRib) leastSlab(e *edition) float64 {
	return max(r.clear/joistSlabShare, e.joist.leastSlab)
}

// sound reports whether nothing that is known of the rib breaks a limit: a
// floor that breaks one is designed as slabs and beams (9.8.1.8), without what
// 9.8 grants to joists.
func (r joistRib) sound(e *edition) bool {
	return units.AtMost(e.joist.leastRib, r.width) && units.AtMost(r.depth, joistSlender*r.width) &&
		units.AtMost(r.clear, e.joist.mostClear) && (r.slab == 0 || units.AtMost(r.leastSlab(e), r.slab))
}

// What is said of joists.
const (
	noteJoist       = "a floor beyond this limit is designed as slabs and beams (9.8.1.8)"
	noteJoistClear  = "the clear distance between the ribs is not given: a slab says it, the width of a flange does not"
	noteJoistNoSlab = "the slab over the ribs is not given: the section has no flange at the top"
)

// appendJoist appends the limits of a rib of a joist floor.
func (e *edition) appendJoist(dst []beam.Check, t *beam.Trial) []beam.Check {
	s := &t.Brief.Section
	if !s.Joist {
		return dst
	}
	r := e.joistRib(s, &t.Geometry)
	compare := func(dst []beam.Check, id, clause string, demand, capacity float64) []beam.Check {
		c := beam.Check{ID: id, Clause: clause, Reason: noteJoist}
		c.Compare(e.lengthOf(demand).Amount(), e.lengthOf(capacity).Amount())
		if t.Record {
			c.Steps = r.steps(e, id)
		}
		return append(dst, c)
	}
	dst = compare(dst, "joist.rib-width", "9.8.1.2", e.joist.leastRib, r.width)
	dst = compare(dst, "joist.rib-depth", "9.8.1.3", r.depth, joistSlender*r.width)
	if r.measured || !units.AtMost(r.clear, e.joist.mostClear) {
		dst = compare(dst, "joist.spacing", "9.8.1.4", r.clear, e.joist.mostClear)
	} else {
		dst = append(dst, beam.NotJudgedCheck("joist.spacing", "9.8.1.4", noteJoistClear))
	}
	switch least := r.leastSlab(e); {
	case r.slab == 0:
		return append(dst, beam.NotJudgedCheck("joist.slab", "9.8.3.1", noteJoistNoSlab))
	case !r.measured && units.AtMost(least, r.slab):
		return append(dst, beam.NotJudgedCheck("joist.slab", "9.8.3.1", noteJoistClear))
	default:
		return compare(dst, "joist.slab", "9.8.3.1", least, r.slab)
	}
}

// unmeasured says where a clear distance that was not given is from.
func (r *joistRib) unmeasured() string {
	if r.measured {
		return ""
	}
	return "at least: the flange reaches no further than half way to the next rib"
}

// steps gives the working of one of the checks.
func (r *joistRib) steps(e *edition, id string) []beam.Step {
	var out working
	switch id {
	case "joist.rib-width":
		out.given("bw", "least width of the rib", "", e.asLength(r.width))
	case "joist.rib-depth":
		out.given("bw", "least width of the rib", "", e.asLength(r.width))
		out.given("h", "overall depth", "", e.asLength(r.height))
		out.given("hf", "thickness of the slab", "", e.asLength(r.slab))
		out.find("hr", "depth of the rib below the slab", "", "h - hf", e.asLength(r.depth))
		out.find("hr,max", "greatest depth of the rib", "9.8.1.3", number(joistSlender)+" bw", e.asLength(joistSlender*r.width))
	case "joist.spacing":
		out.given("sc", "clear distance between ribs", "", e.asLength(r.clear))
		out.note(r.unmeasured())
	case "joist.slab":
		out.given("sc", "clear distance between ribs", "", e.asLength(r.clear))
		out.note(r.unmeasured())
		out.find("hf,min", "least thickness of the slab", "9.8.3.1",
			"max(sc / "+number(joistSlabShare)+", "+number(e.joist.leastSlab)+")", e.asLength(r.leastSlab(e)))
	}
	return out.steps
}
