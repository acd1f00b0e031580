package proof

import (
	"encoding/json"
	"go/ast"
	"go/parser"
	"go/token"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"
)

// root is the top of the module, from this package.
const root = "../../.."

// traps are the numbers of the traps that strength, shear and torsion can fall
// into, as the table lists them.
var traps = []int{1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17, 18, 19, 20, 21, 22, 27}

// TestTrapsAreWatched sees that every trap of the table names tests, that each
// of them exists in its package, and that no trap is missing.
func TestTrapsAreWatched(t *testing.T) {
	data, err := os.ReadFile(filepath.Join(root, "testdata", "traps.json"))
	require.NoError(t, err)
	var table struct {
		Note  string `json:"note"`
		Traps []struct {
			Number int    `json:"number"`
			Trap   string `json:"trap"`
			Clause string `json:"clause"`
			Tests  []struct {
				Package string `json:"package"`
				Test    string `json:"test"`
			} `json:"tests"`
		} `json:"traps"`
	}
	decoder := json.NewDecoder(strings.NewReader(string(data)))
	decoder.DisallowUnknownFields()
	require.NoError(t, decoder.Decode(&table))
	known := map[string]map[string]bool{}
	var listed []int
	for _, trap := range table.Traps {
		listed = append(listed, trap.Number)
		require.NotEmpty(t, trap.Trap, "trap %d", trap.Number)
		require.NotEmpty(t, trap.Clause, "trap %d", trap.Number)
		require.NotEmptyf(t, trap.Tests, "trap %d: %s", trap.Number, trap.Trap)
		for _, test := range trap.Tests {
			if known[test.Package] == nil {
				known[test.Package] = testsOf(t, test.Package)
			}
			require.Truef(t, known[test.Package][test.Test], "trap %d: no test %s in %s", trap.Number, test.Test, test.Package)
		}
	}
	require.Equal(t, traps, listed)
}

// testsOf lists the tests that a package of the module declares.
func testsOf(t *testing.T, pkg string) map[string]bool {
	files, err := filepath.Glob(filepath.Join(root, pkg, "*_test.go"))
	require.NoError(t, err)
	require.NotEmptyf(t, files, "package %s", pkg)
	names := map[string]bool{}
	for _, f := range files {
		file, err := parser.ParseFile(token.NewFileSet(), f, nil, parser.SkipObjectResolution)
		require.NoError(t, err)
		for _, d := range file.Decls {
			if fn, ok := d.(*ast.FuncDecl); ok && fn.Recv == nil && strings.HasPrefix(fn.Name.Name, "Test") {
				names[fn.Name.Name] = true
			}
		}
	}
	return names
}
