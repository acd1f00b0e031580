package beam

import (
	"errors"

	"soffit.example/bars"
	"soffit.example/units"
)

// Code is a design code in one edition: the only source of factors, limits
// and stress blocks. Implementations are immutable values, safe for
// concurrent use; Design and CheckLayout call the methods in the order given
// here.
type Code interface {
	// Edition names the code.
	Edition() Edition

	// Resolve fills the fields that the brief left to the code, listing each
	// as an assumption, and reports values that the code's tables do not
	// know. It sees a copy of the caller's brief and may change it freely.
	Resolve(b *Brief, note *Register) []Fault

	// Combinations lists the factored combinations of the loaded cases, and
	// every other combination of the code with the reason it was dropped.
	Combinations(b *Brief) (kept []Combination, dropped []DroppedCombination)

	// Scope names every rule that puts the problem outside the method,
	// before any strength is computed. Forces are already analysed.
	Scope(p *Problem) []Refusal

	// Cover is the clear cover to the stirrups (or to the bars, where stirrup
	// is zero) that satisfies the code for both sizes. A brief that gives a
	// cover of its own is laid out with that.
	Cover(p *Problem, stirrup, bar bars.Size) units.Length

	// Gaps are the least clear distances between bars of a layer and between
	// layers.
	Gaps(p *Problem) bars.Clearances

	// Allows reports whether the code lets a size be used so; the search
	// skips those it does not.
	Allows(use bars.Use, s bars.Size) bool

	// LeastTension is a lower bound of the tension steel that moments of
	// this sense need when no compression steel helps, with bars no further
	// from the compression face than depth. The search does not try less.
	// ok is false where no amount would do.
	LeastTension(p *Problem, s Sense, depth units.Length) (area units.Area, ok bool)

	// WidestSpacing is an upper bound of the spacing along the beam at which
	// the code could accept stirrups where it requires them, for tension
	// steel at an effective depth. The search proposes no wider ones, even
	// where none are required.
	WidestSpacing(p *Problem, depth units.Length) units.Length

	// Twists reports whether some torque must be designed for, so that closed
	// stirrups and bars all round are needed.
	Twists(p *Problem) bool

	// Spread is the width, centred on the web, over which tension steel at a
	// flanged face is to be spread; zero where all of it may lie in the web.
	Spread(p *Problem, f Face) units.Length

	// Judge appends to dst the checks of one group of limit states on a
	// trial. A check that rests on the bars of one face carries that Face:
	// in bending the tension face. It must not keep the trial. With t.Record it also writes the
	// working into each check; verdicts are the same either way.
	Judge(dst []Check, g Group, t *Trial) []Check

	// Settle lists, for a finished trial and its checks, what the code's
	// expressions assumed and whether the trial bears it out.
	Settle(t *Trial, checks []Check, note *Register)

	// Strengths gives the strengths of a bare section. A code that does not
	// returns an error that wraps ErrNotOffered.
	Strengths(q SectionQuery) (Strengths, error)

	// Cautions are the code's own standing cautions for a result.
	Cautions() []string
}

// ErrNotOffered says that a code has no answer of the kind asked for.
var ErrNotOffered = errors.New("not offered by this design code")

// Edition names a code and the units its formulas are printed in.
type Edition struct {
	ID     string // "ACI 318-19"
	Title  string
	Year   int
	System units.System
	Scope  []string // what the implementation refuses, in words
}

// Group is a set of limit states that are judged together.
type Group uint8

const (
	// Fitting: cover, clear gaps, layers, aggregate, least bars to hold a
	// stirrup. Needs the bars of both faces.
	Fitting Group = iota + 1
	// Bending: strength and strain limits of each sense, least steel, crack
	// spacing. Needs the bars of both faces.
	Bending
	// Shearing: strength, section limit, least stirrups, spacings, ties of
	// compression bars. Needs stirrup zones too.
	Shearing
	// Whole: limits of the member as such, and what this version does not
	// judge.
	Whole
)

// Groups lists every group in the order of judgement.
func Groups() []Group { return []Group{Fitting, Bending, Shearing, Whole} }

// Combination is one factored combination of load cases.
type Combination struct {
	ID      string // "1.2D + 1.6L"
	Clause  string
	Factors []CaseFactor
}

// CaseFactor multiplies the loads of one case.
type CaseFactor struct {
	Case   LoadCase
	Factor float64
}

// DroppedCombination is a combination that was not used, and why.
type DroppedCombination struct {
	ID     string
	Clause string
	Reason string
}

// Refusal is a scope rule that says the method does not apply.
type Refusal struct {
	Rule   string // stable, dotted: "scope.deep-beam"
	Clause string
	Detail string // the values that broke the rule, and the method that would apply
}
