package strict

import "strings"

// Nearest is the known name that a misspelt one most likely meant, or empty
// where none is close.
func Nearest(name string, known []string) string {
	const longest = 64 // so that a hostile name costs little
	if len(name) > longest {
		return ""
	}
	plain := simplify(name)
	best, least := "", len(plain)/2+1
	for _, k := range known {
		target := simplify(k)
		d := edits(plain, target)
		// A name that only leaves something out or adds something ("from"
		// for "from_position") is close however long it is.
		if len(plain) >= 3 && len(target) >= 3 && (strings.Contains(target, plain) || strings.Contains(plain, target)) {
			d = min(d, 1)
		}
		if d < least {
			best, least = k, d
		}
	}
	return best
}

// simplify takes out what spelling conventions differ in.
func simplify(s string) string {
	return strings.NewReplacer("_", "", "-", "", " ", "").Replace(strings.ToLower(s))
}

// edits counts the single-byte changes that turn a into b, a swap of
// neighbours being one (optimal string alignment).
func edits(a, b string) int {
	before, last, row := make([]int, len(b)+1), make([]int, len(b)+1), make([]int, len(b)+1)
	for j := range last {
		last[j] = j
	}
	for i := 1; i <= len(a); i++ {
		row[0] = i
		for j := 1; j <= len(b); j++ {
			change := 1
			if a[i-1] == b[j-1] {
				change = 0
			}
			row[j] = min(last[j]+1, row[j-1]+1, last[j-1]+change)
			if i > 1 && j > 1 && a[i-1] == b[j-2] && a[i-2] == b[j-1] {
				row[j] = min(row[j], before[j-2]+1)
			}
		}
		before, last, row = last, row, before
	}
	return last[len(b)]
}
