package proof

import (
	"context"
	"errors"
	"fmt"
	"math"
	"os"
	"reflect"
	"runtime"
	"slices"
	"strings"
	"sync"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
	"soffit.example/beam/internal/briefs"
	"soffit.example/beam/internal/rederive"
	"soffit.example/units"
)

// seed of every random brief here.
const seed = 8318

// full reports whether the long counts are asked for.
func full() bool { return os.Getenv("SOFFIT_FULL") != "" }

// codes are the editions by id.
var codes = func() map[string]beam.Code {
	m := map[string]beam.Code{}
	for _, c := range aci318.Editions() {
		m[c.Edition().ID] = c
	}
	return m
}()

// designedAs is a brief at the depth that was chosen; that of a polygon is its
// outline's.
func designedAs(b beam.Brief, depth units.Length) beam.Brief {
	if b.Section.Shape != beam.Polygon {
		b.Section.Depth = depth
	}
	return b
}

// parallel runs fn for numbers 0 to n-1 on all processors and returns what it
// said, in order.
func parallel[T any](n int, fn func(i int) T) []T {
	out := make([]T, n)
	var wg sync.WaitGroup
	next := make(chan int)
	for range runtime.GOMAXPROCS(0) {
		wg.Go(func() {
			for i := range next {
				out[i] = fn(i)
			}
		})
	}
	for i := range n {
		next <- i
	}
	close(next)
	wg.Wait()
	return out
}

// answer is what came of one brief.
type answer struct {
	outcome  string            // verdict, or "input error"
	faults   []string          // what is wrong with the answer
	again    int               // layouts judged by both
	loose    []string          // layouts that CheckLayout fails and the re-derivation does not
	agreed   map[string][2]int // by check: how often both find it passing, and failing
	stricter map[string]int    // how often CheckLayout alone finds it failing
	routes   int               // strengths found by both
	mutants  int
	rejected int // mutants that both find wrong
}

// TestRandomBriefs puts random briefs to Design: no panic, nothing that is not
// a number, every outcome classified, and every satisfied re-derived. Layouts
// made a little worse are put to CheckLayout: it must find wrong whatever the
// re-derivation finds wrong.
func TestRandomBriefs(t *testing.T) {
	n := 2000
	if full() {
		n = 10000
	}
	answers := parallel(n, func(i int) answer { return put(uint64(i)) })
	outcomes := map[string]int{}
	mutants, rejected, again, routes, loose := 0, 0, 0, 0, map[string]int{}
	agreed, stricter := map[string][2]int{}, map[string]int{}
	for i, a := range answers {
		s := briefs.Random(seed, uint64(i))
		outcomes[s.Kind.String()+": "+a.outcome]++
		for _, f := range a.faults {
			t.Errorf("brief %d (%s, %s): %s", i, s.Code, s.Kind, f)
		}
		mutants, rejected, again, routes = mutants+a.mutants, rejected+a.rejected, again+a.again, routes+a.routes
		for _, l := range a.loose {
			loose[l]++
		}
		for id, n := range a.agreed {
			sum := agreed[id]
			agreed[id] = [2]int{sum[0] + n[0], sum[1] + n[1]}
		}
		for id, n := range a.stricter {
			stricter[id] += n
		}
	}
	t.Logf("%d briefs: %v", n, outcomes)
	t.Logf("%d layouts judged by both, of them %d made worse and %d of those found wrong by both", again, mutants, rejected)
	t.Logf("failed by CheckLayout, not by the re-derivation, by first failing check: %v", loose)
	t.Logf("%d nominal strengths by two routes", routes)
	t.Logf("found by both to pass and to fail, by check: %v", agreed)
	for _, id := range []string{
		"crack.flange-spacing", "crack.flange-spread", "crack.spacing", "fit.flange", "flexure.minimum.negative", "flexure.minimum.positive",
		"flexure.negative", "flexure.positive", "flexure.strain.negative", "flexure.strain.positive", "hanger.stirrups", "shear.minimum-stirrups",
		"shear.section-limit", "shear.spacing-across", "shear.spacing-along", "shear.strength", "spacing.clear", "torsion.closed",
		"torsion.longitudinal-spacing", "torsion.longitudinal.bottom", "torsion.longitudinal.side", "torsion.longitudinal.top",
		"torsion.minimum-stirrups", "torsion.section", "torsion.spacing-along", "torsion.transverse", "torsion.wall",
	} {
		require.Positivef(t, agreed[id][1], "nothing in which both find that %s fails", id)
	}
	t.Logf("found by CheckLayout alone to fail: %v", stricter)
	require.Greater(t, outcomes["sound: satisfied"], n/5)
	require.Greater(t, outcomes["hopeless: unsatisfied"], n/50)
	require.Greater(t, outcomes["outside: out-of-scope"], n/20)
	require.Greater(t, outcomes["absurd: input error"], n/30)
	require.Greater(t, rejected, n/10)
}

// put designs one brief and looks at the answer from every side.
func put(i uint64) (a answer) {
	wrong := func(format string, args ...any) { a.faults = append(a.faults, fmt.Sprintf(format, args...)) }
	defer func() {
		if r := recover(); r != nil {
			wrong("panic: %v", r)
		}
	}()
	s := briefs.Random(seed, i)
	code := codes[s.Code]
	r, err := beam.Design(context.Background(), code, s.Brief)
	if err != nil {
		a.outcome = "input error"
		var in *beam.InputError
		switch {
		case !errors.As(err, &in) || len(in.Faults) == 0:
			wrong("an error that lists no faults: %v", err)
		case s.Kind == briefs.Sound || s.Kind == briefs.NoCapacity:
			wrong("a sensible brief is refused: %v", err)
		}
		if in != nil {
			for _, f := range in.Faults {
				if len(f.Path) < 2 || f.Path[0] != '/' || f.Detail == "" {
					wrong("a fault without path or detail: %+v", f)
				}
			}
		}
		return a
	}
	a.outcome = r.Verdict.String()
	if path := notFinite(reflect.ValueOf(r), "result", 0); path != "" {
		wrong("%s is not a finite number", path)
	}
	for _, why := range unclassified(r) {
		wrong("%s", why)
	}
	switch r.Verdict {
	case beam.Satisfied:
		brief := s.Brief
		brief = designedAs(brief, r.Section.Depth)
		a.compare(code, s.Code, brief, r.Layout, wrong)
		for k := range r.Alternatives {
			other := brief
			other = designedAs(other, r.Alternatives[k].Depth)
			a.compare(code, s.Code, other, r.Alternatives[k].Layout, wrong)
		}
		for k, m := range mutations(r.Layout, brief) {
			every := 5 // a sample
			if full() {
				every = 3
			}
			if (int(i)+k)%every == 0 {
				a.mutants++
				if !a.compare(code, s.Code, brief, m, wrong) {
					a.rejected++
				}
			}
		}
	case beam.Unsatisfied:
		if len(r.Layout.Longitudinal) > 0 {
			brief := s.Brief
			brief = designedAs(brief, r.Section.Depth)
			a.compare(code, s.Code, brief, r.Layout, wrong)
		}
	}
	return a
}

// compare puts a layout to CheckLayout and to the re-derivation, and reports
// whether the latter finds it well.
func (a *answer) compare(code beam.Code, id string, b beam.Brief, l beam.Layout, wrong func(string, ...any)) bool {
	a.again++
	checked, err := beam.CheckLayout(context.Background(), code, b, l)
	if err != nil {
		var in *beam.InputError
		if !errors.As(err, &in) {
			wrong("CheckLayout: %v", err)
		}
		return false
	}
	if path := notFinite(reflect.ValueOf(checked), "checked", 0); path != "" {
		wrong("%s is not a finite number", path)
	}
	report, err := rederive.Judge(id, b, l)
	if err != nil {
		wrong("re-derivation: %v", err)
		return false
	}
	a.agree(checked, report, l, wrong)
	a.sameStrength(id, checked, report, wrong)
	switch {
	case checked.Verdict == beam.Satisfied && !report.OK():
		wrong("CheckLayout says satisfied, the re-derivation finds %v; cover %v, layout %s", report, b.Cover, describe(l))
	case checked.Verdict == beam.Unsatisfied && report.OK():
		for i := range checked.Checks {
			if checked.Checks[i].Outcome == beam.Fail {
				a.loose = append(a.loose, checked.Checks[i].ID)
				break
			}
		}
	}
	return report.OK()
}

// agree holds the checks of both against each other, id by id: none that
// CheckLayout passes may be found failing.
func (a *answer) agree(checked *beam.Result, report *rederive.Report, l beam.Layout, wrong func(string, ...any)) {
	if a.agreed == nil {
		a.agreed, a.stricter = map[string][2]int{}, map[string]int{}
	}
	most := map[string]float64{}
	for i := range checked.Checks {
		if c := &checked.Checks[i]; judged(c) {
			most[c.ID] = math.Max(most[c.ID], c.Utilization)
		}
	}
	if most["shear.stirrup-angle"] > 1 {
		return // what such stirrups are good for is anybody's guess
	}
	for id, u := range most {
		other, both := report.Judged[id]
		switch fails := u > 1+1e-9; {
		case !both, id == "shear.spacing-along" && inclined(l): // asked only of those that lean against the shear
		case fails && other > 1:
			n := a.agreed[id]
			a.agreed[id] = [2]int{n[0], n[1] + 1}
		case fails:
			if u > 1.002 {
				a.stricter[id]++
			}
		case other > 1+2e-6:
			wrong("%s passes at %g, the re-derivation finds %g; %v; layout %s", id, u, other, report, describe(l))
		default:
			n := a.agreed[id]
			a.agreed[id] = [2]int{n[0] + 1, n[1]}
		}
	}
}

func inclined(l beam.Layout) bool {
	return slices.ContainsFunc(l.Transverse, func(z beam.Zone) bool { return z.Angle != 0 && z.Angle != 90 })
}

// sameStrength compares nominal strengths by two routes, the library's polynomials
// and the summation of the re-derivation. Where more than one equilibrium
// exists both take the first.
func (a *answer) sameStrength(id string, checked *beam.Result, report *rederive.Report, wrong func(string, ...any)) {
	unit := units.PoundInch
	if strings.Contains(id, "M-") {
		unit = units.NewtonMillimetre
	}
	for i := range checked.Flexure {
		f := &checked.Flexure[i]
		if f.Sense == 0 {
			wrong("a strength of no sense: %+v", *f)
			continue
		}
		other := report.Nominal[f.Sense-1]
		if other == 0 || !countsAll(checked, f) {
			continue
		}
		a.routes++
		if got := f.Nominal.In(unit); math.Abs(got/other-1) > 1e-6 {
			wrong("Mn is %.9g, by the re-derivation %.9g (%s); layout %s", got, other, f.Sense, describe(checked.Layout))
		}
	}
}

// unclassified lists what an answer leaves unsaid.
func unclassified(r *beam.Result) (why []string) {
	failing := beam.Failing(r.Checks)
	switch r.Verdict {
	case beam.Satisfied:
		if failing || r.Governing == nil || r.Governing.Utilization > 1+1e-9 || len(r.Layout.Longitudinal) == 0 || len(r.Refusals) > 0 {
			why = append(why, "satisfied with a failing check, without a governing one or without a layout")
		}
	case beam.Unsatisfied:
		if !failing && len(r.Binding) == 0 {
			why = append(why, "unsatisfied without a failing check or a binding limit")
		}
	case beam.OutOfScope:
		if len(r.Refusals) == 0 {
			why = append(why, "out of scope without a refusal")
		}
		for _, f := range r.Refusals {
			if f.Rule == "" || f.Clause == "" || f.Detail == "" {
				why = append(why, fmt.Sprintf("a refusal without a name: %+v", f))
			}
		}
	default:
		why = append(why, "no verdict")
	}
	for i := range r.Checks {
		c := &r.Checks[i]
		switch {
		case c.ID == "" || c.Clause == "" || c.Outcome == 0:
			why = append(why, fmt.Sprintf("a check without id, clause or outcome: %+v", *c))
		case (c.Outcome == beam.NotApplicable || c.Outcome == beam.NotJudged) && c.Reason == "":
			why = append(why, c.ID+" is not judged without a reason")
		case c.Outcome == beam.Pass && c.Utilization > 1+1e-9 || c.Outcome == beam.Fail && c.Utilization <= 1:
			why = append(why, fmt.Sprintf("%s: outcome %s at %g", c.ID, c.Outcome, c.Utilization))
		}
	}
	for i := range r.Rejected {
		if !beam.Failing(r.Rejected[i].Failed) {
			why = append(why, fmt.Sprintf("a rejected arrangement without a failed check: %s", r.Rejected[i].Arrangement.Describe(r.System)))
		}
	}
	return why
}

// notFinite walks a value and names the first float that is not finite.
func notFinite(v reflect.Value, path string, depth int) string {
	if depth > 30 {
		return ""
	}
	switch v.Kind() {
	case reflect.Float32, reflect.Float64:
		if f := v.Float(); math.IsNaN(f) || math.IsInf(f, 0) {
			return path
		}
	case reflect.Pointer, reflect.Interface:
		if !v.IsNil() && v.Type() != reflect.TypeFor[beam.Code]() {
			return notFinite(v.Elem(), path, depth+1)
		}
	case reflect.Struct:
		for i := range v.NumField() {
			if p := notFinite(v.Field(i), path+"."+v.Type().Field(i).Name, depth+1); p != "" {
				return p
			}
		}
	case reflect.Slice, reflect.Array:
		for i := range v.Len() {
			if p := notFinite(v.Index(i), fmt.Sprintf("%s[%d]", path, i), depth+1); p != "" {
				return p
			}
		}
	}
	return ""
}

// countsAll reports whether a strength counts every bar of its tension face:
// those of a flange beyond the width that tension steel is spread over do not.
func countsAll(r *beam.Result, f *beam.FlexureStrength) bool {
	var all units.Area
	flange := false
	for _, row := range r.Layout.Longitudinal {
		if row.Face != f.Sense.TensionFace() {
			continue
		}
		size, err := r.Problem.Catalog.Size(row.Bar)
		if err != nil {
			return false
		}
		all = all.Add(size.Area.Scale(float64(row.Count)))
		flange = flange || row.Flange
	}
	// Side bars that count would stand in for those that do not.
	return !flange || !r.Problem.Brief.Readings.CountSideBars && all.AtMost(f.TensionSteel)
}
