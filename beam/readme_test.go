package beam_test

import (
	"os"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"
)

// The README's snippet is the body of Example, so that what it shows
// compiles and prints what it says.
func TestReadmeSnippetIsTheExample(t *testing.T) {
	readme, err := os.ReadFile("../README.md")
	require.NoError(t, err)
	example, err := os.ReadFile("example_test.go")
	require.NoError(t, err)
	_, after, found := strings.Cut(string(readme), "```go\n")
	require.True(t, found)
	snippet, _, found := strings.Cut(after, "```")
	require.True(t, found)
	for line := range strings.Lines(snippet) {
		require.Contains(t, string(example), strings.TrimSpace(line))
	}
	require.LessOrEqual(t, strings.Count(snippet, "\n"), 25)
}
