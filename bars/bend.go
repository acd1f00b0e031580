package bars

import (
	"math"

	"soffit.example/units"
)

// Use is what a bar does in the beam; bend rules differ by it.
type Use uint8

const (
	Main    Use = iota + 1 // longitudinal reinforcement
	Stirrup                // stirrups, ties and hoops
	uses
)

func (u Use) String() string {
	switch u {
	case Main:
		return "main bar"
	case Stirrup:
		return "stirrup"
	}
	return "bar of unknown use"
}

// Bend is how a bar is bent: the diameter of the bar and the inside diameter
// of its bend.
type Bend struct {
	Bar    units.Length
	Inside units.Length
	Source string // standard and clause
}

// Radius is the inside radius.
func (b Bend) Radius() units.Length { return b.Inside.Scale(0.5) }

// Arc is the length of the bar's centre line through a bend of the given
// angle in degrees.
func (b Bend) Arc(degrees float64) units.Length {
	return b.Radius().Add(b.Bar.Scale(0.5)).Scale(degrees * math.Pi / 180)
}

// Setback is the distance from the outside of a bend of 90 degrees or more to
// the point where the straight begins, measured along the straight: the
// inside radius plus the bar.
func (b Bend) Setback() units.Length { return b.Radius().Add(b.Bar) }

// Deduction is what a 90-degree corner takes off the sum of its two
// out-to-out legs: two setbacks less the arc.
func (b Bend) Deduction() units.Length { return b.Setback().Scale(2).Sub(b.Arc(90)) }

// Hook is a bend at the end of a bar with the straight extension that follows
// it.
type Hook struct {
	Bend
	Angle     int // degrees: 90, 135 or 180
	Extension units.Length
}

// Allowance is what the hook adds to the out-to-out length of the bar, which
// ends at the outside of the hook: its arc and extension less the setback.
func (h Hook) Allowance() units.Length {
	return h.Arc(float64(h.Angle)).Add(h.Extension).Sub(h.Setback())
}

// rule holds the bend and the hooks of one use of a size.
type rule struct {
	bend  Bend // Inside zero: no rule
	hooks []Hook
}

// Bend is the tightest standard bend of the size in a use, by its catalog's
// code; bars of a bundle bend each as a single one. The error is a
// *[NoRuleError] where the catalog has no rule; it has none for bundles as
// stirrups.
func (s Size) Bend(use Use) (Bend, error) {
	if r := s.rule(use); r != nil {
		return r.bend, nil
	}
	return Bend{}, &NoRuleError{Catalog: s.Catalog, Size: s.Name, Use: use}
}

// Hook is the standard hook of the size in a use, by its catalog's code. The
// angle is 90, 135 or 180 degrees. The error is a *[NoRuleError] where the
// catalog has no rule.
func (s Size) Hook(use Use, degrees int) (Hook, error) {
	r := s.rule(use)
	if r == nil {
		return Hook{}, &NoRuleError{Catalog: s.Catalog, Size: s.Name, Use: use}
	}
	for _, h := range r.hooks {
		if h.Angle == degrees {
			return h, nil
		}
	}
	return Hook{}, &NoRuleError{Catalog: s.Catalog, Size: s.Name, Use: use, Angle: degrees}
}

func (s Size) rule(use Use) *rule {
	if s.rec == nil || use == 0 || use >= uses || s.rec.rules[use].bend.Inside.IsZero() {
		return nil
	}
	if s.bundled > 1 && use != Main {
		return nil
	}
	return &s.rec.rules[use]
}
