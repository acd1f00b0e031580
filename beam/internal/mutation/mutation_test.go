package mutation

import (
	"context"
	"os"
	"path/filepath"
	"regexp"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"
)

const tiny = "./testdata/tiny"

// Which mutants of the tiny package its tests kill was worked out by reading
// them.
func TestTinyPackage(t *testing.T) {
	before := sources(t)
	report, err := Run(context.Background(), Options{Package: tiny, Jobs: 4})
	require.NoError(t, err)
	require.Empty(t, report.Excluded)
	require.False(t, report.Partial)
	require.Equal(t, before, sources(t), "the source tree is not touched")

	got := map[Outcome][]string{}
	for _, v := range report.Verdicts {
		got[v.Outcome] = append(got[v.Outcome], v.In+": "+v.Before+" -> "+v.After)
	}
	require.Equal(t, []string{
		"table: factor: 2 -> factor: 2.020001",
		"Most: a < b -> a >= b",
		"Scaled: table.factor * x -> table.factor / x",
		"Both: a && b -> !(a && b)",
		"Both: a && b -> a || b",
		"Count: sum := 0 -> sum := 1",
		"Count: i < n -> i <= n",
		"Count: i < n -> i >= n",
		"Count: sum += i -> nothing",
		"Count: sum += i -> sum -= i",
		"Clamp: math.Min(max(x, -1), 1) -> math.Max(max(x, -1), 1)",
		"Clamp: max(x, -1) -> min(x, -1)",
		"Length.Add: l.m + k.m -> l.m - k.m",
		"Length.AtMost: l.m <= k.m -> l.m < k.m",
		"Length.AtMost: l.m <= k.m -> l.m > k.m",
		"Fits: a.Add(b).AtMost(room) -> !room.AtMost(a.Add(b))",
		"Fits: a.Add(b).AtMost(room) -> !a.Add(b).AtMost(room)",
		"Fits: a.Add(b) -> a.Sub(b)",
		"Halvings: n > 1 -> n >= 1",
		"Halvings: n > 1 -> n <= 1",
		"Halvings: n > 1 -> n > 2",
		"Halvings: n /= 2 -> n *= 2", // until it overflows
		"Halvings: n /= 2 -> n /= 3",
		"Halvings: k++ -> nothing",
		"Rare: n == 57 -> n != 57",
		"Rare: n == 57 -> n == 58", // by all checks, after few did not
	}, got[Killed])
	require.Equal(t, []string{
		"Halvings: n /= 2 -> nothing",
	}, got[TimedOut])
	require.Equal(t, []string{
		"table: unused: 3 -> unused: 3.030001",
		"Most: a < b -> a <= b",   // equal numbers are the same either way
		"Count: i := 0 -> i := 1", // so is a sum without its zero
		"Clamp: max(x, -1) -> max(x, -1.009999)",
		"Clamp: math.Min(max(x, -1), 1) -> math.Min(max(x, -1), 1.010001)",
	}, got[Survived])
	require.Equal(t, []string{
		"Length.Sub: l.m - k.m -> l.m + k.m",
		"Never: -n -> n",
	}, got[NotCovered])
}

// sources are the texts of the tiny package as they stand.
func sources(t *testing.T) map[string]string {
	t.Helper()
	entries, err := os.ReadDir(tiny)
	require.NoError(t, err)
	out := map[string]string{}
	for _, e := range entries {
		text, err := os.ReadFile(filepath.Join(tiny, e.Name()))
		require.NoError(t, err)
		out[e.Name()] = string(text)
	}
	return out
}

func TestChoice(t *testing.T) {
	all, err := List(Options{Package: tiny})
	require.NoError(t, err)
	for i, m := range all {
		require.Equal(t, i+1, m.ID)
		require.Equal(t, "beam/internal/mutation/testdata/tiny/tiny.go", m.File)
		require.Positive(t, m.Line)
	}
	few, err := List(Options{Package: tiny, Sample: 5, Seed: 3})
	require.NoError(t, err)
	require.Len(t, few, 5)
	again, err := List(Options{Package: tiny, Sample: 5, Seed: 3})
	require.NoError(t, err)
	require.Equal(t, few, again, "the same seed draws the same sample")
	only, err := List(Options{Package: tiny, Only: []int{2, 7}})
	require.NoError(t, err)
	require.Equal(t, []Mutant{all[1], all[6]}, only)
	none, err := List(Options{Package: tiny, Files: regexp.MustCompile("^other")})
	require.NoError(t, err)
	require.Empty(t, none)
}

func TestWrongPackages(t *testing.T) {
	for _, pattern := range []string{"./nowhere", "./...", "soffit.example/nowhere"} {
		_, err := List(Options{Package: pattern})
		require.Error(t, err, pattern)
	}
}

func TestReport(t *testing.T) {
	mutant := func(id int, file, in string) Mutant {
		return Mutant{ID: id, File: file, Line: 10 * id, In: in, Before: "a < b", After: "a <= b"}
	}
	r := Report{Package: "example/p", Excluded: []string{"TestAlloc"}, Verdicts: []Verdict{
		{Mutant: mutant(1, "p/a.go", "F"), Outcome: Killed, By: "TestF"},
		{Mutant: mutant(2, "p/a.go", "G"), Outcome: Survived},
		{Mutant: mutant(3, "p/b.go", "T.H"), Outcome: TimedOut},
		{Mutant: mutant(4, "p/b.go", "T.K"), Outcome: NotCovered},
	}}
	require.Equal(t, Counts{Killed: 1, TimedOut: 1, Survived: 1, NotCovered: 1}, r.Counts())
	require.Equal(t, 50.0, r.Counts().Rate())
	require.Equal(t, 100.0, Counts{}.Rate())

	known, err := ReadEquivalents(strings.NewReader("p/a.go: G: a < b -> a <= b\n\tequal values are the same\n\teither way\n" +
		"p/a.go: F: a < b -> a <= b\n\tso it was thought\np/c.go: F: a < b -> a <= b\n\tin another file\n"))
	require.NoError(t, err)
	require.Equal(t, 1, r.Unexplained(known))
	var out strings.Builder
	require.NoError(t, r.Write(&out, known))
	require.Equal(t, `  mutants  killed  timed out  survived  not covered  percent
        2       1          0         1            0     50.0  p/a.go
        2       0          1         0            1     50.0  p/b.go
        4       1          1         1            1     50.0  example/p
left out, as it fails without a mutant: TestAlloc

alive: 1
p/b.go:40: a < b -> a <= b	[4 not covered in T.K]

alive, and explained: 1
p/a.go:20: a < b -> a <= b	[2 survived in G]
	equal values are the same either way

explained, but not alive: 1
p/a.go: F: a < b -> a <= b
`, out.String())
	r.Partial = true
	out.Reset()
	require.NoError(t, r.Write(&out, known))
	require.NotContains(t, out.String(), "not alive", "of a part nothing is known of the rest")
}

func TestReadEquivalents(t *testing.T) {
	known, err := ReadEquivalents(strings.NewReader(`# a heading

p/a.go: F: 1 -> 2
p/a.go: G: 1 -> 2
	both for one reason
p/b.go: F: x -> nothing
	another
`))
	require.NoError(t, err)
	require.Equal(t, Equivalents{
		"p/a.go: F: 1 -> 2": "both for one reason", "p/a.go: G: 1 -> 2": "both for one reason", "p/b.go: F: x -> nothing": "another",
	}, known)
	for _, wrong := range []string{
		"p/a.go: F: 1 -> 2\n",
		"\ta reason\n",
		"p/a.go: F\n\ta reason\n",
		"p/a.go: F: 1 -> 2\n\ta reason\np/a.go: F: 1 -> 2\n\tagain\n",
	} {
		_, err := ReadEquivalents(strings.NewReader(wrong))
		require.Error(t, err, wrong)
	}
}

// The list of equivalents is well formed, and names files that are there.
func TestListOfEquivalents(t *testing.T) {
	f, err := os.Open("equivalents.txt")
	require.NoError(t, err)
	defer f.Close()
	known, err := ReadEquivalents(f)
	require.NoError(t, err)
	require.NotEmpty(t, known)
	for key := range known {
		file, _, _ := strings.Cut(key, ": ")
		require.FileExists(t, filepath.Join("../../..", file), key)
	}
}
