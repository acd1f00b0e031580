package beam

import "soffit.example/units"

// Check is one limit state judged at one place. Demand and Capacity are
// arranged so that the check passes while Demand/Capacity is at most one:
// for a least amount Demand is the amount required and Capacity the amount
// provided; for a greatest spacing Demand is the spacing provided.
type Check struct {
	ID          string // stable, dotted, most general word first: "shear.spacing-along"
	Clause      string // of the code that judged
	Span        int    // 1-based; zero: the whole beam or a demand given directly
	At          units.Length
	HasAt       bool // At is meaningful
	Face        Face // zero: none
	Combination string
	Demand      units.Amount
	Capacity    units.Amount
	Utilization float64
	Outcome     Outcome
	// Detailing marks a rule of arrangement that a layout is commonly drawn
	// to exactly, such as a cover or a spacing. It governs only if it fails.
	Detailing bool
	Reason    string // why not applicable or not judged, or what was decided on the way
	Steps     []Step // the working, in order; only in a final judgement
}

// Step is one line of the working: a value that was given or computed, the
// clause it follows and the expression it came from, in the symbols of the
// steps before it. Unit is the unit that the clause is written in; empty
// leaves the choice to whoever prints.
type Step struct {
	Symbol     string
	Meaning    string
	Clause     string
	Expression string // empty for an input
	Value      units.Amount
	Unit       string
	Note       string // the branch taken, the cap that acted
}

// Compare sets Demand, Capacity, Utilization and Outcome from two amounts of
// one dimension. A limit met exactly passes.
func (c *Check) Compare(demand, capacity units.Amount) {
	c.Demand, c.Capacity = demand, capacity
	d, k := demand.SI(), capacity.SI()
	switch {
	case d <= 0:
		c.Utilization = 0
	case k <= 0:
		c.Utilization = NoCapacity
	default:
		c.Utilization = min(d/k, NoCapacity)
	}
	c.Outcome = Fail
	if c.Utilization <= NoCapacity/2 && units.AtMost(c.Utilization, 1) {
		c.Outcome = Pass
	}
}

// NoCapacity is the utilization of a check whose capacity is nil. It is finite
// so that results always print and compare.
const NoCapacity = 1e9

// NotJudgedCheck reports a limit state that belongs to the job and was not
// judged, with the reason.
func NotJudgedCheck(id, clause, reason string) Check {
	return Check{ID: id, Clause: clause, Outcome: NotJudged, Reason: reason}
}

// NotApplicableCheck reports a limit state that the standard does not ask for
// here, with the reason.
func NotApplicableCheck(id, clause, reason string) Check {
	return Check{ID: id, Clause: clause, Outcome: NotApplicable, Reason: reason}
}

// Failing reports whether any check failed.
func Failing(checks []Check) bool {
	for i := range checks {
		if checks[i].Outcome == Fail {
			return true
		}
	}
	return false
}

// Governing is the judged check with the largest utilization, rules of
// arrangement that are kept left aside; nil if none was judged.
func Governing(checks []Check) *Check {
	var g *Check
	for i := range checks {
		c := &checks[i]
		if c.Outcome != Pass && c.Outcome != Fail || c.Detailing && c.Outcome == Pass {
			continue
		}
		if g == nil || c.Utilization > g.Utilization {
			g = c
		}
	}
	return g
}
