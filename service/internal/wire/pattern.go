package wire

import (
	"encoding/json"
	"errors"
	"slices"
	"strings"
)

// Pattern is how live load is patterned: one of PatternWords, or false, which
// is the empty Pattern.
type Pattern string

// PatternWords lists the patterns that have a word.
func PatternWords() []string { return []string{"spans", "code", "loads"} }

// Allowed says what UnmarshalJSON reads.
func (Pattern) Allowed() string { return "false, " + strings.Join(PatternWords(), ", ") }

// UnmarshalJSON reads false or a word. Its error is a clause without subject.
func (p *Pattern) UnmarshalJSON(data []byte) error {
	if string(data) == "false" {
		*p = ""
		return nil
	}
	var word string
	if err := json.Unmarshal(data, &word); err != nil || !slices.Contains(PatternWords(), word) {
		return errors.New("must be one of " + p.Allowed())
	}
	*p = Pattern(word)
	return nil
}

// MarshalJSON writes what UnmarshalJSON reads.
func (p Pattern) MarshalJSON() ([]byte, error) {
	if p == "" {
		return []byte("false"), nil
	}
	return json.Marshal(string(p))
}
