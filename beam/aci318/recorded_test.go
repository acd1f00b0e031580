package aci318

import (
	"bufio"
	"context"
	"flag"
	"fmt"
	"math"
	"os"
	"path/filepath"
	"reflect"
	"strconv"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

var update = flag.Bool("update", false, "rewrite the recorded calculations")

// recorded is a calculation with a name: a layout of a brief that is judged, or
// a question about a bare section.
type recorded struct {
	name   string
	code   Code
	brief  beam.Brief
	layout beam.Layout
	query  *beam.SectionQuery // in place of brief and layout
	faulty bool               // is refused as input
}

// Whole calculations stand in testdata/recorded as an engineer would read them:
// every check with its working, what was assumed, every strength. They are
// records of what the package says, which show any change of it; that the
// numbers are right rests on the published values, closed forms and hand
// calculations of the other tests. Run with -update to write them anew, and read
// the difference.
//
// Every step that states an expression is computed again from it.
func TestRecordedRectangles(t *testing.T)   { requireRecorded(t, "rectangles", recordedRectangles()) }
func TestRecordedConcretes(t *testing.T)    { requireRecorded(t, "concretes", recordedConcretes()) }
func TestRecordedFlanges(t *testing.T)      { requireRecorded(t, "flanges", recordedFlanges()) }
func TestRecordedShapes(t *testing.T)       { requireRecorded(t, "shapes", recordedShapes()) }
func TestRecordedJoists(t *testing.T)       { requireRecorded(t, "joists", recordedJoists()) }
func TestRecordedAxialForces(t *testing.T)  { requireRecorded(t, "axial-forces", recordedAxialForces()) }
func TestRecordedStirrups(t *testing.T)     { requireRecorded(t, "stirrups", recordedStirrups()) }
func TestRecordedSlopingSteel(t *testing.T) { requireRecorded(t, "sloping-steel", recordedSloping()) }
func TestRecordedHungLoads(t *testing.T)    { requireRecorded(t, "hung-loads", recordedHung()) }
func TestRecordedTorsion(t *testing.T)      { requireRecorded(t, "torsion", recordedTorsion()) }
func TestRecordedPressedBars(t *testing.T)  { requireRecorded(t, "pressed-bars", recordedPressed()) }
func TestRecordedDeepBeams(t *testing.T)    { requireRecorded(t, "deep-beams", recordedDeep()) }
func TestRecordedQueries(t *testing.T)      { requireRecorded(t, "queries", recordedQueries()) }

// requireRecorded compares calculations with their file, each of them a section
// of it.
func requireRecorded(t *testing.T, file string, list []recorded) {
	t.Helper()
	a := account{said: map[string]string{}}
	for i := range list {
		list[i].write(t, &a)
	}
	path := filepath.Join("testdata", "recorded", file+".txt")
	if *update {
		require.NoError(t, os.WriteFile(path, a.text, 0o644))
	}
	want, err := os.ReadFile(path)
	require.NoError(t, err)
	requireSameLines(t, path, string(want), string(a.text))
}

// requireSameLines points to the first line that differs, which says more than
// the difference of two long texts.
func requireSameLines(t *testing.T, path, want, got string) {
	t.Helper()
	if want == got {
		return
	}
	w, g := bufio.NewScanner(strings.NewReader(want)), bufio.NewScanner(strings.NewReader(got))
	title := ""
	for line := 1; ; line++ {
		more, other := w.Scan(), g.Scan()
		if strings.HasPrefix(g.Text(), "== ") {
			title = g.Text()
		}
		require.Equal(t, w.Text(), g.Text(), "%s, line %d, %s", path, line, title)
		require.Equal(t, more, other, "%s ends early", path)
		require.True(t, more, "%s differs in its line ends", path)
	}
}

// account is the text of calculations.
type account struct {
	text   []byte
	system units.System
	title  string              // of the calculation being written
	steps  map[string][]string // its workings, by the ids of checks
	order  []string            // those ids
	said   map[string]string   // the title under which something was said first
	alike  []string            // what is the same in the calculation
	before string              // of this title
}

func (a *account) line(format string, args ...any) {
	s := fmt.Sprintf(format, args...)
	a.text = append(append(a.text, strings.TrimRight(s, " ")...), '\n')
}

// once writes something, or refers to the calculation that says the same, line
// by line.
func (a *account) once(name string, write func()) {
	page := a.text
	a.text = nil
	write()
	said := string(a.text)
	a.text = page
	first, again := a.said[said]
	if !again {
		a.refer()
		a.text = append(a.text, said...)
		a.said[said] = strconv.Quote(a.title)
		return
	}
	if first != a.before {
		a.refer()
	}
	a.alike, a.before = append(a.alike, name), first
}

// refer writes what is the same as in an earlier calculation.
func (a *account) refer() {
	if len(a.alike) > 0 {
		a.line("%s: as in %s", strings.Join(a.alike, ", "), a.before)
	}
	a.alike = nil
}

// write judges or answers, and writes all of it.
func (r *recorded) write(t *testing.T, a *account) {
	t.Helper()
	a.system = r.code.Edition().System
	a.title = r.name + ", " + r.code.Edition().ID
	a.steps, a.order = map[string][]string{}, nil
	a.line("== %s", a.title)
	if r.query != nil {
		s, err := r.code.Strengths(*r.query)
		require.NoError(t, err, r.name)
		a.refusals(s.Refusals)
		a.fields("flexure", reflect.ValueOf(s.Flexure))
		a.fields("shear", reflect.ValueOf(s.Shear))
		a.fields("torsion", reflect.ValueOf(s.Torsion))
		for _, n := range s.Notes {
			a.line("note: %s", n)
		}
		a.checks(t, s.Checks)
		a.refer()
		a.line("")
		return
	}
	out, err := beam.CheckLayout(context.Background(), r.code, r.brief, r.layout)
	require.Equal(t, r.faulty, err != nil, "%s: %v", r.name, err)
	if r.faulty {
		a.line("%v\n", err)
		return
	}
	a.line("%s", out.Verdict)
	a.refusals(out.Refusals)
	if g := out.Governing; g != nil {
		a.line("governed by %s", g.ID)
	}
	for _, x := range out.Assumptions {
		a.once(x.ID, func() {
			a.line("%s: %s", x.ID, x.Assumed)
			a.line("    found: %s; holds %t, open %t, decisive %t; used in %s", x.Found, x.Holds, x.Open, x.Decisive, strings.Join(x.UsedIn, ", "))
		})
	}
	for _, f := range out.Flexure {
		a.once("flexure", func() { a.fields("flexure", reflect.ValueOf(f)) })
	}
	a.checks(t, out.Checks)
	for _, c := range out.Cautions {
		a.once("caution", func() { a.line("caution: %s", c) })
	}
	a.refer()
	a.line("")
}

func (a *account) refusals(list []beam.Refusal) {
	for _, x := range list {
		a.line("refused: %s, %s: %s", x.Rule, x.Clause, x.Detail)
	}
}

// checks writes each check with its working, of which it computes every step
// again.
func (a *account) checks(t *testing.T, list []beam.Check) {
	t.Helper()
	for i := range list {
		if list[i].Clause != "geometry" { // of package beam
			a.once(list[i].ID, func() { a.check(t, &list[i]) })
		}
	}
}

func (a *account) check(t *testing.T, c *beam.Check) {
	t.Helper()
	a.line("%s, %s: %s", c.ID, c.Clause, c.Outcome)
	var place []string
	if c.Span != 0 {
		place = append(place, fmt.Sprintf("span %d", c.Span))
	}
	if c.HasAt {
		place = append(place, "at "+a.amount(c.At.Amount()))
	}
	if c.Face != 0 {
		place = append(place, c.Face.String())
	}
	if c.Combination != "" {
		place = append(place, c.Combination)
	}
	if c.Detailing {
		place = append(place, "a rule of arrangement")
	}
	if len(place) > 0 {
		a.line("    %s", strings.Join(place, ", "))
	}
	if c.Outcome == beam.Pass || c.Outcome == beam.Fail {
		a.line("    %s of %s: %s", a.amount(c.Demand), a.amount(c.Capacity), digits(c.Utilization))
	}
	if c.Reason != "" {
		a.line("    %s", c.Reason)
	}
	if len(c.Steps) == 0 {
		return
	}
	requireEvaluable(t, c)
	var steps []string
	for i := range c.Steps {
		require.NotEmpty(t, c.Steps[i].Symbol, c.ID)
		steps = append(steps, a.step(&c.Steps[i]))
	}
	common, of := a.begun(steps)
	if common > 1 {
		a.line("      %s to %s as in %s", c.Steps[0].Symbol, c.Steps[common-1].Symbol, of)
	} else {
		common = 0
	}
	for _, s := range steps[common:] {
		a.line("      %s", s)
	}
	name := c.ID
	for n := 2; a.steps[name] != nil; n++ {
		name = fmt.Sprintf("%s (%d)", c.ID, n)
	}
	a.steps[name], a.order = steps, append(a.order, name)
}

// begun finds the earlier check of the calculation whose working begins most
// like this one, and with how many steps.
func (a *account) begun(steps []string) (common int, of string) {
	for _, name := range a.order {
		n := 0
		for n < len(steps) && n < len(a.steps[name]) && steps[n] == a.steps[name][n] {
			n++
		}
		if n > common {
			common, of = n, name
		}
	}
	return common, of
}

// step is a step as it is written.
func (a *account) step(s *beam.Step) string {
	unit := s.Unit
	if unit == "" {
		unit = a.system.Unit(s.Value.Dimension())
	}
	text := s.Symbol
	if s.Expression != "" {
		text += " = " + s.Expression
	}
	text += " = " + amountIn(s.Value, unit)
	text += " | " + s.Meaning
	for _, x := range []string{s.Clause, s.Note} {
		if x != "" {
			text += " | " + x
		}
	}
	return text
}

func (a *account) amount(v units.Amount) string {
	return amountIn(v, a.system.Unit(v.Dimension()))
}

func amountIn(v units.Amount, unit string) string {
	x, err := v.In(unit)
	if err != nil {
		return err.Error()
	}
	return strings.TrimSpace(digits(x) + " " + unit)
}

// digits gives ten of them, without what rounding leaves of nothing.
func digits(x float64) string {
	if math.Abs(x) < 1e-9 {
		return "0"
	}
	return strconv.FormatFloat(x, 'g', 10, 64)
}

// fields writes every field of a strength that is not zero.
func (a *account) fields(name string, v reflect.Value) {
	if v.IsZero() {
		return
	}
	switch x := v.Interface().(type) {
	case interface{ Amount() units.Amount }:
		a.line("  %s: %s", name, a.amount(x.Amount()))
	case fmt.Stringer:
		a.line("  %s: %s", name, x)
	case float64:
		a.line("  %s: %s", name, digits(x))
	default:
		switch v.Kind() {
		case reflect.Struct:
			for i := range v.NumField() {
				a.fields(name+"."+v.Type().Field(i).Name, v.Field(i))
			}
		case reflect.Slice:
			for i := range v.Len() {
				a.fields(fmt.Sprintf("%s[%d]", name, i), v.Index(i))
			}
		default:
			a.line("  %s: %v", name, x)
		}
	}
}
