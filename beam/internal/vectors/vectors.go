// Package vectors reads the published check values of testdata/vectors, whose
// form testdata/vectors/README.md describes. Only tests use it.
package vectors

import (
	"bytes"
	"encoding/json"
	"errors"
	"fmt"
	"math"
	"os"
	"path/filepath"
	"testing"

	"soffit.example/units"
)

// Group is values of one source.
type Group struct {
	Source Source `json:"source"`
	Tests  []Test `json:"tests"`
}

// Source says where values come from.
type Source struct {
	Authors    string `json:"authors,omitempty"`
	Title      string `json:"title,omitempty"`
	Edition    string `json:"edition,omitempty"`
	Year       int    `json:"year,omitempty"`
	Example    string `json:"example,omitempty"`
	Provenance string `json:"provenance"`
}

// Test is one case.
type Test struct {
	ID      string              `json:"id"`
	Asks    string              `json:"asks"`
	Codes   []string            `json:"codes"`
	Comment string              `json:"comment,omitempty"`
	Options map[string]string   `json:"options,omitempty"`
	Inputs  map[string]Input    `json:"inputs"`
	Expect  map[string]Expected `json:"expect"`
}

// Input is a given quantity.
type Input struct {
	Value json.Number `json:"value"`
	Unit  string      `json:"unit,omitempty"`
}

// Expected is a quantity to be met.
type Expected struct {
	Value     float64 `json:"value"`
	Unit      string  `json:"unit,omitempty"`
	Tolerance float64 `json:"tolerance"`
	Why       string  `json:"why"`
}

// Load reads a file of testdata/vectors by its path from there. It fails t if
// the file has a field that is not known, or a case without what it needs.
func Load(t testing.TB, name string) []Group {
	t.Helper()
	data, err := os.ReadFile(filepath.Join(root(t), "testdata", "vectors", filepath.FromSlash(name)))
	if err != nil {
		t.Fatal(err)
	}
	var file struct {
		Groups []Group `json:"groups"`
	}
	d := json.NewDecoder(bytes.NewReader(data))
	d.DisallowUnknownFields()
	if err := d.Decode(&file); err != nil {
		t.Fatalf("%s: %v", name, err)
	}
	if err := check(file.Groups); err != nil {
		t.Fatalf("%s: %v", name, err)
	}
	return file.Groups
}

// check reports the first case that lacks what it needs.
func check(groups []Group) error {
	if len(groups) == 0 {
		return errors.New("no groups")
	}
	seen := map[string]bool{}
	for _, g := range groups {
		if g.Source.Provenance == "" {
			return errors.New("a source without provenance")
		}
		for _, c := range g.Tests {
			switch {
			case seen[c.ID]:
				return fmt.Errorf("id %q twice", c.ID)
			case len(c.Codes) == 0 || len(c.Expect) == 0:
				return fmt.Errorf("%s: codes or expectations are missing", c.ID)
			}
			seen[c.ID] = true
			for quantity, e := range c.Expect {
				if !(e.Tolerance > 0) || e.Why == "" {
					return fmt.Errorf("%s: %s has no tolerance or does not say why", c.ID, quantity)
				}
			}
		}
	}
	return nil
}

// root is the folder of the module.
func root(t testing.TB) string {
	t.Helper()
	dir, err := os.Getwd()
	if err != nil {
		t.Fatal(err)
	}
	for {
		if _, err := os.Stat(filepath.Join(dir, "go.mod")); err == nil {
			return dir
		}
		parent := filepath.Dir(dir)
		if parent == dir {
			t.Fatal("no go.mod above the test")
		}
		dir = parent
	}
}

// Case is a test as it runs under one code: it knows which inputs were used.
type Case struct {
	Test
	t    testing.TB
	used map[string]bool
}

// Run runs every case of the groups once for each of its codes.
func Run(t *testing.T, groups []Group, run func(t *testing.T, c *Case, code string)) {
	for _, g := range groups {
		for _, test := range g.Tests {
			for _, code := range test.Codes {
				t.Run(test.ID+"/"+code, func(t *testing.T) {
					c := &Case{Test: test, t: t, used: map[string]bool{}}
					run(t, c, code)
					for name := range c.Inputs {
						if !c.used[name] {
							t.Errorf("input %q was not used", name)
						}
					}
				})
			}
		}
	}
}

// Has reports whether an input is given.
func (c *Case) Has(name string) bool {
	_, ok := c.Inputs[name]
	return ok
}

// Amount reads an input of a dimension; it must be given.
func (c *Case) Amount(name string, d units.Dimension) units.Amount {
	c.t.Helper()
	in, ok := c.Inputs[name]
	if !ok {
		c.t.Fatalf("input %q is missing", name)
	}
	c.used[name] = true
	a, err := units.AmountOf(d, in.Value.String(), in.Unit)
	if err != nil {
		c.t.Fatalf("input %q: %v", name, err)
	}
	return a
}

// Length reads an input; zero where it is not given.
func (c *Case) Length(name string) (v units.Length) {
	if c.Has(name) {
		v, _ = c.Amount(name, units.DimLength).Length()
	}
	return v
}

// Area reads an input; zero where it is not given.
func (c *Case) Area(name string) (v units.Area) {
	if c.Has(name) {
		v, _ = c.Amount(name, units.DimArea).Area()
	}
	return v
}

// Stress reads an input; zero where it is not given.
func (c *Case) Stress(name string) (v units.Stress) {
	if c.Has(name) {
		v, _ = c.Amount(name, units.DimStress).Stress()
	}
	return v
}

// Force reads an input; zero where it is not given.
func (c *Case) Force(name string) (v units.Force) {
	if c.Has(name) {
		v, _ = c.Amount(name, units.DimForce).Force()
	}
	return v
}

// Moment reads an input; zero where it is not given.
func (c *Case) Moment(name string) (v units.Moment) {
	if c.Has(name) {
		v, _ = c.Amount(name, units.DimMoment).Moment()
	}
	return v
}

// Number reads a plain input; zero where it is not given.
func (c *Case) Number(name string) (v float64) {
	if c.Has(name) {
		v, _ = c.Amount(name, units.None).Plain()
	}
	return v
}

// Meet compares what was found with every expectation; one without a finding
// fails.
func (c *Case) Meet(found map[string]units.Amount) {
	c.t.Helper()
	for name, e := range c.Expect {
		a, ok := found[name]
		if !ok {
			c.t.Errorf("nothing was found for %q", name)
			continue
		}
		v, err := a.In(e.Unit)
		if err != nil {
			c.t.Errorf("%s: %v", name, err)
			continue
		}
		if !(math.Abs(v-e.Value) <= e.Tolerance*(1+1e-9)) {
			c.t.Errorf("%s is %v %s, expected %v within %v (%s)", name, v, e.Unit, e.Value, e.Tolerance, e.Why)
		}
	}
}
