package proof

import (
	"context"
	"errors"
	"fmt"
	"math"
	"os"
	"reflect"
	"runtime"
	"sync"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
	"soffit.example/beam/internal/briefs"
	"soffit.example/beam/internal/rederive"
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
	outcome  string   // verdict, or "input error"
	faults   []string // what is wrong with the answer
	again    int      // layouts judged by both
	loose    []string // layouts that CheckLayout fails and the re-derivation does not
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
	mutants, rejected, again, loose := 0, 0, 0, map[string]int{}
	for i, a := range answers {
		s := briefs.Random(seed, uint64(i))
		outcomes[s.Kind.String()+": "+a.outcome]++
		for _, f := range a.faults {
			t.Errorf("brief %d (%s, %s): %s", i, s.Code, s.Kind, f)
		}
		mutants, rejected, again = mutants+a.mutants, rejected+a.rejected, again+a.again
		for _, l := range a.loose {
			loose[l]++
		}
	}
	t.Logf("%d briefs: %v", n, outcomes)
	t.Logf("%d layouts judged by both, of them %d made worse and %d of those found wrong by both", again, mutants, rejected)
	t.Logf("failed by CheckLayout, not by the re-derivation, by first failing check: %v", loose)
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
		brief.Section = r.Section
		a.compare(code, s.Code, brief, r.Layout, wrong)
		for k := range r.Alternatives {
			other := brief
			other.Section.Depth = r.Alternatives[k].Depth
			a.compare(code, s.Code, other, r.Alternatives[k].Layout, wrong)
		}
		for k, m := range mutations(r.Layout, brief) {
			if (int(i)+k)%3 == 0 { // a sample
				a.mutants++
				if !a.compare(code, s.Code, brief, m, wrong) {
					a.rejected++
				}
			}
		}
	case beam.Unsatisfied:
		if len(r.Layout.Longitudinal) > 0 {
			brief := s.Brief
			brief.Section = r.Section
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
