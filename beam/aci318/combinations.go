package aci318

import (
	"strconv"
	"strings"

	"soffit.example/beam"
)

// loadRules are the factored combinations of 5.3.1. They are plain numbers,
// the same in every edition here.
type loadRules struct{ combinations []printedCombination }

var (
	loadsUS = loadRules{printedCombinations}
	loadsSI = loadRules{printedCombinations}
)

// printedCombination is one combination as printed, with one of its
// alternatives written out. Terms stand in printed order; a term that may act
// either way has reversible set.
type printedCombination struct {
	clause  string
	leading beam.LoadCase
	terms   []term
}

type term struct {
	factor     float64
	load       beam.LoadCase
	reversible bool
}

// printedCombinations lists 5.3.1(a) to (g). Roof live load, snow and rain are
// alternatives, each a combination of its own. The live-load factor of (c),
// (d) and (e) stays 1.0: the 0.5 that 5.3.3 permits depends on the occupancy.
var printedCombinations = list531()

func list531() []printedCombination {
	roof := []beam.LoadCase{beam.RoofLive, beam.Snow, beam.Rain}
	of := func(f float64, c beam.LoadCase) term { return term{factor: f, load: c} }
	either := func(f float64, c beam.LoadCase) term { return term{factor: f, load: c, reversible: true} }
	var out []printedCombination
	add := func(clause string, leading beam.LoadCase, terms ...term) {
		out = append(out, printedCombination{clause, leading, terms})
	}
	add("5.3.1(a)", beam.Dead, of(1.4, beam.Dead))
	for _, r := range roof {
		add("5.3.1(b)", beam.Live, of(1.2, beam.Dead), of(1.6, beam.Live), of(0.5, r))
	}
	for _, r := range roof {
		add("5.3.1(c)", r, of(1.2, beam.Dead), of(1.6, r), of(1, beam.Live))
		add("5.3.1(c)", r, of(1.2, beam.Dead), of(1.6, r), either(0.5, beam.Wind))
	}
	for _, r := range roof {
		add("5.3.1(d)", beam.Wind, of(1.2, beam.Dead), either(1, beam.Wind), of(1, beam.Live), of(0.5, r))
	}
	add("5.3.1(e)", beam.Earthquake, of(1.2, beam.Dead), either(1, beam.Earthquake), of(1, beam.Live), of(0.2, beam.Snow))
	add("5.3.1(f)", beam.Wind, of(0.9, beam.Dead), either(1, beam.Wind))
	add("5.3.1(g)", beam.Earthquake, of(0.9, beam.Dead), either(1, beam.Earthquake))
	return out
}

// combinations lists what 5.3.1 asks of the loaded cases, and why each other
// combination was dropped.
func (e *edition) combinations(b *beam.Brief) (kept []beam.Combination, dropped []beam.DroppedCombination) {
	if len(b.Demands) > 0 {
		return nil, nil // factored already
	}
	loaded := loadedCases(b)
	for _, p := range e.loads.combinations {
		drop := func(id, reason string) {
			dropped = append(dropped, beam.DroppedCombination{ID: id, Clause: p.clause, Reason: reason})
		}
		if !loaded[p.leading] {
			drop(p.id("±", nil), "the brief has no "+caseName(p.leading)+" load, which leads it")
			continue
		}
		signs := []string{"+"}
		if i := p.reversible(); i >= 0 && loaded[p.terms[i].load] {
			signs = []string{"+", "-"}
		}
		for _, sign := range signs {
			c := beam.Combination{ID: p.id(sign, &loaded), Clause: p.clause, Factors: p.factors(sign, loaded)}
			if same := find(kept, c.Factors); same != nil {
				whole := sign
				if len(signs) == 1 {
					whole = "±"
				}
				drop(p.id(whole, nil), "without "+p.unloaded(loaded)+" it is the same as "+same.ID)
				continue
			}
			kept = append(kept, c)
		}
	}
	return kept, dropped
}

// loadedCases marks the cases that the brief loads, by case; self-weight is a
// dead load.
func loadedCases(b *beam.Brief) (loaded [beam.Earthquake + 1]bool) {
	loaded[beam.Dead] = !b.NoSelfWeight
	for i := range b.Loads {
		if c := b.Loads[i].Case; c >= beam.Dead && c <= beam.Earthquake {
			loaded[c] = true
		}
	}
	return loaded
}

// id writes the terms of the loaded cases, or all of them where loaded is nil;
// sign is that of the reversible term: "+", "-" or "±".
func (p *printedCombination) id(sign string, loaded *[beam.Earthquake + 1]bool) string {
	var b strings.Builder
	for _, t := range p.terms {
		if loaded != nil && !loaded[t.load] {
			continue
		}
		if b.Len() > 0 {
			s := "+"
			if t.reversible {
				s = sign
			}
			b.WriteString(" " + s + " ")
		} else if t.reversible && sign != "+" {
			b.WriteString(sign)
		}
		b.WriteString(strconv.FormatFloat(t.factor, 'f', 1, 64) + caseSymbol(t.load))
	}
	return b.String()
}

func (p *printedCombination) factors(sign string, loaded [beam.Earthquake + 1]bool) []beam.CaseFactor {
	var out []beam.CaseFactor
	for _, t := range p.terms {
		if !loaded[t.load] {
			continue
		}
		f := t.factor
		if t.reversible && sign == "-" {
			f = -f
		}
		out = append(out, beam.CaseFactor{Case: t.load, Factor: f})
	}
	return out
}

// reversible is the index of the term that may act either way; -1 if none.
func (p *printedCombination) reversible() int {
	for i, t := range p.terms {
		if t.reversible {
			return i
		}
	}
	return -1
}

// unloaded names the cases of the combination that the brief does not load.
func (p *printedCombination) unloaded(loaded [beam.Earthquake + 1]bool) string {
	var names []string
	for _, t := range p.terms {
		if !loaded[t.load] {
			names = append(names, caseName(t.load))
		}
	}
	return strings.Join(names, " and ") + " load"
}

// find returns the combination of the same factors; the order of terms does
// not matter.
func find(kept []beam.Combination, factors []beam.CaseFactor) *beam.Combination {
	for i := range kept {
		if sameFactors(kept[i].Factors, factors) {
			return &kept[i]
		}
	}
	return nil
}

func sameFactors(a, b []beam.CaseFactor) bool {
	if len(a) != len(b) {
		return false
	}
	for _, x := range a {
		found := false
		for _, y := range b {
			found = found || x == y
		}
		if !found {
			return false
		}
	}
	return true
}

// caseSymbol is the symbol of 5.3.1.
func caseSymbol(c beam.LoadCase) string {
	switch c {
	case beam.Dead:
		return "D"
	case beam.Live:
		return "L"
	case beam.RoofLive:
		return "Lr"
	case beam.Snow:
		return "S"
	case beam.Rain:
		return "R"
	case beam.Wind:
		return "W"
	}
	return "E"
}

func caseName(c beam.LoadCase) string {
	if c == beam.RoofLive {
		return "roof live"
	}
	return c.String()
}
