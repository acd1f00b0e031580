package beam

import (
	"fmt"
	"math"
	"strconv"
	"strings"

	"soffit.example/units"
)

// Describe says an arrangement in words: "5 #6, one layer".
func (a Arrangement) Describe(sys units.System) string {
	var b strings.Builder
	if a.Bar != "" {
		fmt.Fprintf(&b, "%s stirrups, %d legs, at %s", a.Bar, a.Legs, sys.Format(a.Spacing.Amount()))
		if a.Zones > 1 {
			fmt.Fprintf(&b, ", %d zones", a.Zones)
		}
		return b.String()
	}
	layers := 0
	for _, l := range a.Layers {
		if l.Count[0] == 0 {
			break
		}
		if layers > 0 {
			b.WriteString(" under ")
		}
		fmt.Fprintf(&b, "%d %s", l.Count[0], l.Size[0])
		if l.Count[1] > 0 {
			fmt.Fprintf(&b, " + %d %s", l.Count[1], l.Size[1])
		}
		layers++
	}
	if layers == 1 {
		b.WriteString(", one layer")
	}
	if a.Beside.Count[0] > 0 {
		fmt.Fprintf(&b, ", with %d %s in the flange", a.Beside.Count[0], a.Beside.Size[0])
	}
	fmt.Fprintf(&b, ", %s, in %s stirrups", a.Face, a.With)
	if a.Pressed.Count[0] > 0 {
		fmt.Fprintf(&b, ", with %d %s relied on in compression", a.Pressed.Count[0], a.Pressed.Size[0])
	}
	return b.String()
}

// Describe says a check in one line: what it is, both sides, and the clause.
func (c *Check) Describe(sys units.System) string {
	switch c.Outcome {
	case NotApplicable, NotJudged:
		return fmt.Sprintf("%s: %s (%s): %s", c.ID, c.Outcome, c.Clause, c.Reason)
	}
	if c.Outcome == Fail && c.Utilization >= NoCapacity && c.Reason != "" {
		return fmt.Sprintf("%s: fails (%s): %s", c.ID, c.Clause, c.Reason)
	}
	relation := "<="
	if c.Outcome == Fail {
		relation = ">"
	}
	s := fmt.Sprintf("%s: %s %s %s (%s)", c.ID, Short(sys, c.Demand), relation, Short(sys, c.Capacity), c.Clause)
	if c.Reason != "" {
		s += ": " + c.Reason
	}
	return s
}

// Short prints an amount to five significant digits, enough to read beside a
// limit or in a sentence.
func Short(sys units.System, a units.Amount) string {
	v := sys.Float(a)
	digits := 0
	if v != 0 && math.Abs(v) < 1e-6 {
		return strings.TrimSpace(strconv.FormatFloat(v, 'e', 1, 64) + " " + sys.Unit(a.Dimension()))
	}
	if v != 0 {
		digits = max(0, 4-int(math.Floor(math.Log10(math.Abs(v)))))
	}
	number := strconv.FormatFloat(v, 'f', digits, 64)
	if strings.Contains(number, ".") {
		number = strings.TrimRight(strings.TrimRight(number, "0"), ".")
	}
	return strings.TrimSpace(number + " " + sys.Unit(a.Dimension()))
}
