package archtest

import (
	"go/parser"
	"go/token"
	"io/fs"
	"os"
	"path"
	"path/filepath"
	"strconv"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"
)

const module = "soffit.example"

// floors lists, from the ground up, which packages of the module a package
// may import. A package whose path is not listed follows the longest listed
// prefix; what stands under an internal directory may import what its parent
// may, and its parent.
var floors = map[string][]string{
	"units":          {},
	"bars":           {"units"},
	"beam/statics":   {"units"},
	"beam/mechanics": {"units"},
	"beam":           {"units", "bars", "beam/statics", "beam/mechanics"},
	"beam/working":   {"units", "beam"},
	"beam/aci318":    {"units", "bars", "beam/mechanics", "beam/statics", "beam"},
	"service":        {"units", "bars", "beam/statics", "beam", "beam/working"},
	"service/soffitd": {
		"service", "beam", "beam/aci318",
	},
	"examples": {"units", "bars", "beam/statics", "beam/mechanics", "beam", "beam/working", "beam/aci318", "service"},
	// What only tests share, and generators, may look at everything below
	// the service.
	"beam/internal":    {"units", "bars", "beam/statics", "beam/mechanics", "beam", "beam/working", "beam/aci318", "beam/internal"},
	"service/internal": {"units", "bars", "beam/statics", "beam", "beam/working", "service", "service/internal"},
}

// outside lists the only packages that may import a module from elsewhere;
// test files may import any that go.mod has.
var outside = map[string][]string{
	"github.com/labstack/echo/v4":            {"service"},
	"github.com/go-playground/validator/v10": {"service"},
	"github.com/go-json-experiment/json":     {"service"},
	"github.com/shopspring/decimal":          {"units", "bars", "beam", "service"},
	"github.com/getkin/kin-openapi":          {"service/internal"},
	"golang.org/x/sync":                      {"service"},
}

func TestImportsPointDown(t *testing.T) {
	root, err := filepath.Abs("../../..")
	require.NoError(t, err)
	packages := 0
	err = filepath.WalkDir(root, func(file string, d fs.DirEntry, err error) error {
		if err != nil {
			return err
		}
		if d.IsDir() {
			if name := d.Name(); file != root && (strings.HasPrefix(name, ".") || name == "testdata") {
				return fs.SkipDir
			}
			return nil
		}
		if !strings.HasSuffix(file, ".go") {
			return nil
		}
		rel, err := filepath.Rel(root, filepath.Dir(file))
		require.NoError(t, err)
		checkFile(t, filepath.ToSlash(rel), file)
		packages++
		return nil
	})
	require.NoError(t, err)
	require.Greater(t, packages, 20, "the walk must see the module")
}

func checkFile(t *testing.T, pkg, file string) {
	f, err := parser.ParseFile(token.NewFileSet(), file, nil, parser.ImportsOnly)
	require.NoError(t, err)
	test := strings.HasSuffix(file, "_test.go")
	for _, spec := range f.Imports {
		imported, err := strconv.Unquote(spec.Path.Value)
		require.NoError(t, err)
		inner, ours := strings.CutPrefix(imported, module+"/")
		switch {
		case ours && inner == pkg:
		case ours && test:
			require.Falsef(t, above(pkg, inner), "%s: a test of %s imports %s, which stands above it", file, pkg, inner)
		case ours:
			require.Truef(t, allowed(pkg, inner), "%s: %s must not import %s", file, pkg, inner)
		case strings.Contains(strings.SplitN(imported, "/", 2)[0], ".") && !test:
			require.Truef(t, mayUse(pkg, imported), "%s: %s must not import %s", file, pkg, imported)
		}
	}
}

// floor is the entry of floors that governs a package.
func floor(pkg string) (string, []string) {
	for p := pkg; p != "."; p = path.Dir(p) {
		if list, ok := floors[p]; ok {
			return p, list
		}
	}
	return "", nil
}

func allowed(pkg, imported string) bool {
	under, list := floor(pkg)
	if imported == under || strings.HasPrefix(imported, under+"/internal/") || parentOfInternal(pkg) == imported {
		return true
	}
	for _, a := range list {
		if imported == a || strings.HasSuffix(a, "/internal") && strings.HasPrefix(imported, a+"/") {
			return true
		}
	}
	return false
}

// parentOfInternal is the package that holds the internal directory a
// package stands in.
func parentOfInternal(pkg string) string {
	before, _, found := strings.Cut(pkg, "/internal")
	if !found {
		return ""
	}
	return before
}

// above reports whether what a test imports stands on a higher floor: a test
// of units may not lean on beam. Tests of the model may use the code packages
// that implement it, from outside.
func above(pkg, imported string) bool {
	rank := func(p string) int {
		switch {
		case strings.HasPrefix(p, "units"):
			return 0
		case strings.HasPrefix(p, "bars"):
			return 1
		case strings.HasPrefix(p, "beam/statics"), strings.HasPrefix(p, "beam/mechanics"):
			return 2
		case strings.HasPrefix(p, "beam"):
			return 3
		}
		return 4
	}
	return rank(imported) > rank(pkg) && !strings.HasPrefix(imported, "beam/internal/")
}

func mayUse(pkg, imported string) bool {
	for prefix, users := range outside {
		if imported != prefix && !strings.HasPrefix(imported, prefix+"/") {
			continue
		}
		for _, u := range users {
			if pkg == u || strings.HasPrefix(pkg, u+"/") {
				return true
			}
		}
	}
	return false
}

// The top level is the project's front door; what is not listed is not there.
func TestTopLevel(t *testing.T) {
	entries, err := os.ReadDir("../../..")
	require.NoError(t, err)
	known := map[string]bool{
		"beam": true, "units": true, "bars": true, "service": true, "examples": true, "testdata": true,
		"README.md": true, "DEVELOPERS.md": true, "go.mod": true, "go.sum": true,
	}
	for _, e := range entries {
		require.Truef(t, known[e.Name()] || strings.HasPrefix(e.Name(), "."), "%s does not belong at the top level", e.Name())
	}
}
