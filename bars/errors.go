package bars

import (
	"fmt"
	"strconv"
	"strings"
)

// RangeError reports an input outside its range.
type RangeError struct {
	Field   string // "width", "layers[1][0].count"
	Value   string // with its unit
	Allowed string // "more than 0 m, at most 100 m"
}

func (e *RangeError) Error() string {
	return fmt.Sprintf("bars: %s is %s, allowed: %s", e.Field, e.Value, e.Allowed)
}

// UnknownError reports a name that is not in a list.
type UnknownError struct {
	Kind    string   // "catalog", "size", "grade"
	Within  string   // id of the catalog searched; empty for catalogs
	Name    string   // as asked for
	Nearest string   // the known name most like it
	Known   []string // all of them
}

func (e *UnknownError) Error() string {
	within := ""
	if e.Within != "" {
		within = " in catalog " + e.Within
	}
	return fmt.Sprintf("bars: no %s %q%s; nearest known %q (known: %s)",
		e.Kind, e.Name, within, e.Nearest, strings.Join(e.Known, ", "))
}

// NoRuleError reports that a catalog holds no bend or hook rule for a use of
// a size: either its code has none, or it is not known surely enough to be
// entered.
type NoRuleError struct {
	Catalog string
	Size    string
	Use     Use
	Angle   int // of the hook, degrees; zero if the bend itself has no rule
}

func (e *NoRuleError) Error() string {
	what := "bend rule"
	if e.Angle != 0 {
		what = fmt.Sprintf("rule for a %d-degree hook", e.Angle)
	}
	where := "catalog " + e.Catalog
	if e.Catalog == "" {
		where = "a size made by hand"
	}
	return fmt.Sprintf("bars: no %s for %s as a %s (%s)", what, e.Size, e.Use, where)
}

// unknown builds an UnknownError whose Nearest has the closest number in its
// name, and among equals the fewest edits.
func unknown(kind, within, name string, known []string) *UnknownError {
	e := &UnknownError{Kind: kind, Within: within, Name: name, Known: known}
	best := [2]int{-1, 0}
	for _, k := range known {
		score := [2]int{numberGap(name, k), edits(name, k)}
		if best[0] < 0 || score[0] < best[0] || score[0] == best[0] && score[1] < best[1] {
			best, e.Nearest = score, k
		}
	}
	return e
}

// numberGap is the distance between the first numbers in a and b, and zero
// if either has none. Digits beyond the fourth do not count.
func numberGap(a, b string) int {
	x, okx := firstNumber(a)
	y, oky := firstNumber(b)
	if !okx || !oky {
		return 0
	}
	return max(x-y, y-x)
}

func firstNumber(s string) (n int, ok bool) {
	digits := 0
	for _, c := range []byte(s) {
		switch {
		case c >= '0' && c <= '9':
			if digits < 4 {
				n = 10*n + int(c-'0')
			}
			digits++
		case digits > 0:
			return n, true
		}
	}
	return n, digits > 0
}

// edits is the Levenshtein distance over bytes, of at most the first 64 of
// each string, so that a hostile name costs little.
func edits(a, b string) int {
	a, b = a[:min(len(a), 64)], b[:min(len(b), 64)]
	var row [65]int
	for j := range row {
		row[j] = j
	}
	for i := 1; i <= len(a); i++ {
		diagonal := row[0]
		row[0] = i
		for j := 1; j <= len(b); j++ {
			cost := 1
			if a[i-1] == b[j-1] {
				cost = 0
			}
			diagonal, row[j] = row[j], min(row[j]+1, row[j-1]+1, diagonal+cost)
		}
	}
	return row[len(b)]
}

func countError(field string, n int) error {
	return &RangeError{Field: field, Value: strconv.Itoa(n), Allowed: "1 to " + strconv.Itoa(MaxBars)}
}

func formatFactor(v float64) string { return strconv.FormatFloat(v, 'g', -1, 64) }
