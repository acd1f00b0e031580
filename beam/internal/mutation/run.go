package mutation

import (
	"bytes"
	"cmp"
	"context"
	"encoding/json"
	"errors"
	"fmt"
	"io"
	"math/rand/v2"
	"os"
	"os/exec"
	"path/filepath"
	"regexp"
	"slices"
	"strconv"
	"strings"
	"sync"
	"time"
)

// Options say what to run. Only Package is needed.
type Options struct {
	Dir     string // where the go command runs; empty: here
	Package string // as the go command takes it

	Files  *regexp.Regexp // mutate only files of these names; nil: all
	Only   []int          // run only these mutants; empty: all
	Sample int            // run this many, drawn by Seed; 0: all
	Seed   uint64

	Jobs     int     // processes at once; 0: one
	Patience float64 // a run may last this many times its clean time, and two seconds; 0: eight
	Checks   int     // asked of a property in the first round; 0: 25
	Long     bool    // without -test.short
	Quick    bool    // without the second round

	Progress io.Writer // nil: none
	Output   io.Writer // of the tests that kill; nil: nowhere
}

// Outcome is what became of a mutant.
type Outcome uint8

// Outcomes.
const (
	Killed Outcome = iota + 1
	TimedOut
	Survived
	NotCovered
)

func (o Outcome) String() string {
	switch o {
	case Killed:
		return "killed"
	case TimedOut:
		return "timed out"
	case Survived:
		return "survived"
	case NotCovered:
		return "not covered"
	}
	return "unknown"
}

// A Verdict is a mutant and what became of it.
type Verdict struct {
	Mutant
	Outcome Outcome
	By      string // the test that killed it, where it says so
}

// List gives the mutants of a package.
func List(o Options) ([]Mutant, error) {
	s, err := load(o.Dir, o.Package)
	if err != nil {
		return nil, err
	}
	mutants, _ := rewrite(s)
	return o.choose(mutants), nil
}

// choose gives the mutants that the options ask for, in order.
func (o *Options) choose(all []Mutant) []Mutant {
	out := o.ofFiles(all)
	if len(o.Only) > 0 {
		out = slices.DeleteFunc(out, func(m Mutant) bool { return !slices.Contains(o.Only, m.ID) })
	}
	if o.Sample > 0 && o.Sample < len(out) {
		rand.New(rand.NewPCG(o.Seed, 0)).Shuffle(len(out), func(i, k int) { out[i], out[k] = out[k], out[i] })
		out = out[:o.Sample]
		slices.SortFunc(out, func(a, b Mutant) int { return cmp.Compare(a.ID, b.ID) })
	}
	return out
}

// ofFiles gives the mutants of the files that the options ask for.
func (o *Options) ofFiles(all []Mutant) (out []Mutant) {
	for _, m := range all {
		if o.Files == nil || o.Files.MatchString(filepath.Base(m.File)) {
			out = append(out, m)
		}
	}
	return out
}

// Run makes the mutants of a package and puts each to its tests.
func Run(ctx context.Context, o Options) (*Report, error) {
	o.Jobs, o.Checks = cmp.Or(o.Jobs, 1), cmp.Or(o.Checks, 25)
	o.Patience = cmp.Or(o.Patience, 8)
	if o.Progress == nil {
		o.Progress = io.Discard
	}
	s, err := load(o.Dir, o.Package)
	if err != nil {
		return nil, err
	}
	all, text := rewrite(s)
	chosen := o.choose(all)
	work, err := os.MkdirTemp("", "mutation")
	if err != nil {
		return nil, err
	}
	defer os.RemoveAll(work)
	h := &harness{Options: o, source: s, work: work}
	if err := h.build(ctx, text, len(all)); err != nil {
		return nil, err
	}
	report := &Report{Package: s.path, Partial: len(chosen) < len(o.ofFiles(all))}
	if err := h.survey(ctx, report); err != nil {
		return nil, err
	}
	report.Verdicts = make([]Verdict, len(chosen))
	var queue []int
	for i, m := range chosen {
		report.Verdicts[i] = Verdict{Mutant: m, Outcome: Survived}
		if len(h.reach[m.ID]) == 0 {
			report.Verdicts[i].Outcome = NotCovered
			continue
		}
		queue = append(queue, i)
	}
	rounds := []round{{name: "few checks", few: true}}
	if len(h.property) > 0 && !o.Quick {
		rounds = append(rounds, round{name: "all checks"})
	}
	for _, r := range rounds {
		queue, err = h.round(ctx, r, report, queue)
		if err != nil {
			return nil, err
		}
	}
	return report, nil
}

// harness holds the test binary of the mutants and what is known of its tests.
type harness struct {
	Options
	*source
	work   string
	binary string
	rapid  bool // the binary takes the flags of pgregory.net/rapid

	took     map[string]time.Duration // a test, with few checks
	property map[string]bool          // tests that make checks of rapid
	reach    map[int][]string         // tests by mutant, the quick ones first
}

// build compiles the tests of the package against its rewritten files.
func (h *harness) build(ctx context.Context, text []string, mutants int) error {
	replace := map[string]string{}
	put := func(name, as, text string) error {
		replace[name] = filepath.Join(h.work, as)
		return os.WriteFile(replace[name], []byte(text), 0o600)
	}
	for i, name := range h.names {
		if err := put(name, filepath.Base(name), text[i]); err != nil {
			return err
		}
	}
	helpers := "mutation_helpers_of_a_run.go"
	if err := put(filepath.Join(h.dir, helpers), helpers, helperFile(h.name, mutants)); err != nil {
		return err
	}
	overlay, err := json.Marshal(map[string]any{"Replace": replace})
	if err != nil {
		return err
	}
	overlayFile := filepath.Join(h.work, "overlay.json")
	if err := os.WriteFile(overlayFile, overlay, 0o600); err != nil {
		return err
	}
	h.binary = filepath.Join(h.work, "mutants.test")
	cmd := exec.CommandContext(ctx, "go", "test", "-c", "-vet=off", "-overlay", overlayFile, "-o", h.binary, h.path)
	cmd.Dir = h.dir
	if out, err := cmd.CombinedOutput(); err != nil {
		return fmt.Errorf("building the mutants of %s: %w\n%s", h.path, err, out)
	}
	if _, err := os.Stat(h.binary); err != nil {
		return fmt.Errorf("%s has no tests", h.path)
	}
	probe := exec.CommandContext(ctx, h.binary, "-test.run=^$", "-rapid.checks=1")
	probe.Dir = h.dir
	h.rapid = probe.Run() == nil
	return nil
}

// survey runs each test without a mutant: how long it takes, and where it goes.
func (h *harness) survey(ctx context.Context, report *Report) error {
	cmd := exec.CommandContext(ctx, h.binary, "-test.list=^(Test|Example|Fuzz)")
	cmd.Dir = h.dir
	out, err := cmd.Output()
	if err != nil {
		return fmt.Errorf("listing the tests of %s: %w", h.path, err)
	}
	tests := strings.Fields(string(out))
	h.took, h.property, h.reach = map[string]time.Duration{}, map[string]bool{}, map[int][]string{}
	var lock sync.Mutex
	err = h.parallel(len(tests), func(i int) error {
		note := filepath.Join(h.work, "reached."+strconv.Itoa(i))
		started := time.Now()
		res, err := h.run(ctx, round{few: true, verbose: true}, 0, tests[i:i+1], 10*time.Minute, "MUTATION_REACHED="+note)
		took := time.Since(started)
		if err != nil {
			return err
		}
		lock.Lock()
		defer lock.Unlock()
		if res.failed {
			report.Excluded = append(report.Excluded, tests[i])
			fmt.Fprintf(h.Progress, "%s fails without a mutant and is left out:\n%s\n", tests[i], res.output)
			return nil
		}
		h.took[tests[i]] = took
		if strings.Contains(res.output, "[rapid] OK") {
			h.property[tests[i]] = true
		}
		reached, err := os.ReadFile(note)
		if err != nil && !errors.Is(err, os.ErrNotExist) {
			return err
		}
		for _, field := range strings.Fields(string(reached)) {
			id, err := strconv.Atoi(field)
			if err != nil {
				return err
			}
			h.reach[id] = append(h.reach[id], tests[i])
		}
		return nil
	})
	slices.Sort(report.Excluded)
	for _, list := range h.reach {
		slices.SortFunc(list, func(a, b string) int { return cmp.Or(cmp.Compare(h.took[a], h.took[b]), cmp.Compare(a, b)) })
	}
	var total time.Duration
	for _, took := range h.took {
		total += took
	}
	fmt.Fprintf(h.Progress, "%s: %d tests, %s of one process\n", h.path, len(tests), total.Round(100*time.Millisecond))
	return err
}

// A round puts mutants to their tests, properties with few checks or with all.
// With all of them only properties are run: the other tests would do again what
// they did.
type round struct {
	name    string
	few     bool
	verbose bool
}

// round gives those that survive it.
func (h *harness) round(ctx context.Context, r round, report *Report, queue []int) (left []int, err error) {
	started, done := time.Now(), 0
	var lock sync.Mutex
	err = h.parallel(len(queue), func(i int) error {
		v := &report.Verdicts[queue[i]]
		outcome, by, err := h.put(ctx, r, v.ID)
		if err != nil {
			return err
		}
		v.Outcome, v.By = outcome, by
		lock.Lock()
		defer lock.Unlock()
		if done++; outcome == Survived {
			left = append(left, queue[i])
		}
		if done%100 == 0 || done == len(queue) {
			fmt.Fprintf(h.Progress, "%s: %s: %d of %d, %d alive, %s\n", h.path, r.name, done, len(queue), len(left), time.Since(started).Round(time.Second))
		}
		return nil
	})
	slices.Sort(left)
	return left, err
}

// put runs the tests that reach a mutant until one fails, in batches that take
// ever longer.
func (h *harness) put(ctx context.Context, r round, id int) (Outcome, string, error) {
	tests, budget := h.reach[id], 100*time.Millisecond
	if !r.few {
		tests = slices.DeleteFunc(slices.Clone(tests), func(name string) bool { return !h.property[name] })
	}
	for len(tests) > 0 {
		n, clean := 0, time.Duration(0)
		for n < len(tests) && (n == 0 || clean+h.took[tests[n]] <= budget) {
			clean += h.took[tests[n]]
			n++
		}
		limit := 2*time.Second + time.Duration(float64(h.checks(r))/float64(h.Checks)*h.Patience*float64(clean))
		res, err := h.run(ctx, r, id, tests[:n], limit)
		switch {
		case err != nil:
			return 0, "", err
		case res.late:
			return TimedOut, "", nil
		case res.failed:
			if h.Output != nil {
				fmt.Fprintf(h.Output, "mutant %d:\n%s\n", id, res.output)
			}
			return Killed, firstFailure(res.output), nil
		}
		tests, budget = tests[n:], budget*5
	}
	return Survived, "", nil
}

// checks is the number of checks to ask for. All are the hundred that rapid makes
// by itself; under -test.short it makes a fifth of what it is asked for.
func (h *harness) checks(r round) int {
	switch {
	case r.few:
		return h.Checks
	case h.Long:
		return 100
	}
	return 500
}

type result struct {
	failed, late bool
	output       string
}

// run runs tests under one mutant, or under none.
func (h *harness) run(ctx context.Context, r round, id int, tests []string, limit time.Duration, env ...string) (result, error) {
	args := []string{"-test.failfast", "-test.run=^(" + strings.Join(tests, "|") + ")$"}
	if !h.Long {
		args = append(args, "-test.short")
	}
	if r.verbose {
		args = append(args, "-test.v")
	}
	if h.rapid {
		args = append(args, "-rapid.seed=1", "-rapid.nofailfile", "-rapid.shrinktime=1ms")
		args = append(args, "-rapid.checks="+strconv.Itoa(h.checks(r)))
	}
	bounded, cancel := context.WithTimeout(ctx, limit)
	defer cancel()
	cmd := exec.CommandContext(bounded, h.binary, args...)
	cmd.Dir = h.dir
	cmd.Env = append(append(os.Environ(), "MUTATION_ACTIVE="+strconv.Itoa(id), "MUTATION_REACHED="), env...)
	cmd.WaitDelay = time.Second
	out := &head{most: 1 << 24}
	cmd.Stdout, cmd.Stderr = out, out
	err := cmd.Run()
	var exit *exec.ExitError
	switch {
	case ctx.Err() != nil:
		return result{}, ctx.Err()
	case err == nil:
		return result{output: out.String()}, nil
	case bounded.Err() != nil:
		return result{late: true, failed: true, output: out.String()}, nil
	case errors.As(err, &exit):
		return result{failed: true, output: out.String()}, nil
	}
	return result{}, fmt.Errorf("running the tests of %s: %w", h.path, err)
}

// head keeps the beginning of what is written.
type head struct {
	bytes.Buffer
	most int
}

func (t *head) Write(p []byte) (int, error) {
	t.Buffer.Write(p[:min(len(p), max(t.most-t.Len(), 0))])
	return len(p), nil
}

var failure = regexp.MustCompile(`(?m)^--- FAIL: (\S+)`)

func firstFailure(output string) string {
	if m := failure.FindStringSubmatch(output); m != nil {
		return m[1]
	}
	return ""
}

// parallel calls f for 0 to n-1, as many at once as there are jobs, and stops
// at the first error.
func (h *harness) parallel(n int, f func(i int) error) error {
	var (
		wait  sync.WaitGroup
		lock  sync.Mutex
		next  int
		first error
	)
	for range min(h.Jobs, n) {
		wait.Go(func() {
			for {
				lock.Lock()
				i := next
				next++
				stop := first != nil || i >= n
				lock.Unlock()
				if stop {
					return
				}
				if err := f(i); err != nil {
					lock.Lock()
					first = cmp.Or(first, err)
					lock.Unlock()
				}
			}
		})
	}
	wait.Wait()
	return first
}
