package mutation

import (
	"bufio"
	"cmp"
	"fmt"
	"io"
	"slices"
	"strings"
	"text/tabwriter"
)

// A Report is what became of the mutants of a package.
type Report struct {
	Package  string
	Verdicts []Verdict // in the order of mutants
	Excluded []string  // tests that fail without a mutant, only by being rewritten
	Partial  bool      // not all mutants of the files that it names
}

// Counts are numbers of mutants.
type Counts struct{ Killed, TimedOut, Survived, NotCovered int }

func (c *Counts) add(o Outcome) {
	switch o {
	case Killed:
		c.Killed++
	case TimedOut:
		c.TimedOut++
	case Survived:
		c.Survived++
	case NotCovered:
		c.NotCovered++
	}
}

// Total is how many mutants were made.
func (c Counts) Total() int { return c.Killed + c.TimedOut + c.Survived + c.NotCovered }

// Rate is the share of mutants killed, in percent; those that timed out are,
// those not covered are not. It is 100 of none.
func (c Counts) Rate() float64 {
	if c.Total() == 0 {
		return 100
	}
	return 100 * float64(c.Killed+c.TimedOut) / float64(c.Total())
}

// Counts are those of the whole report.
func (r *Report) Counts() (c Counts) {
	for i := range r.Verdicts {
		c.add(r.Verdicts[i].Outcome)
	}
	return c
}

// Alive are the mutants that survived or were not covered.
func (r *Report) Alive() []Verdict {
	var out []Verdict
	for _, v := range r.Verdicts {
		if v.Outcome == Survived || v.Outcome == NotCovered {
			out = append(out, v)
		}
	}
	return out
}

// Write prints the report: counts by file, then each survivor, first those that
// nothing explains.
func (r *Report) Write(w io.Writer, known Equivalents) error {
	b := bufio.NewWriter(w)
	files := map[string]*Counts{}
	for i := range r.Verdicts {
		v := &r.Verdicts[i]
		if files[v.File] == nil {
			files[v.File] = &Counts{}
		}
		files[v.File].add(v.Outcome)
	}
	var names []string
	for name := range files {
		names = append(names, name)
	}
	slices.Sort(names)
	table := tabwriter.NewWriter(b, 0, 0, 2, ' ', tabwriter.AlignRight)
	row := func(name string, c Counts) {
		fmt.Fprintf(table, "%d\t%d\t%d\t%d\t%d\t%.1f\t  %s\n", c.Total(), c.Killed, c.TimedOut, c.Survived, c.NotCovered, c.Rate(), name)
	}
	fmt.Fprintf(table, "mutants\tkilled\ttimed out\tsurvived\tnot covered\tpercent\t\n")
	for _, name := range names {
		row(name, *files[name])
	}
	row(r.Package, r.Counts())
	if err := table.Flush(); err != nil {
		return err
	}
	for _, name := range r.Excluded {
		fmt.Fprintf(b, "left out, as it fails without a mutant: %s\n", name)
	}
	var open, explained, dead []string
	alive := map[string]bool{}
	for _, v := range r.Alive() {
		alive[v.key()] = true
		line := fmt.Sprintf("%s:%d: %s -> %s\t[%d %s in %s]", v.File, v.Line, v.Before, v.After, v.ID, v.Outcome, v.In)
		if reason, ok := known[v.key()]; ok {
			explained = append(explained, line+"\n\t"+reason)
			continue
		}
		open = append(open, line)
	}
	section := func(title string, lines []string) {
		if len(lines) > 0 {
			fmt.Fprintf(b, "\n%s: %d\n%s\n", title, len(lines), strings.Join(lines, "\n"))
		}
	}
	section("alive", open)
	section("alive, and explained", explained)
	for key := range known {
		if file, _, _ := strings.Cut(key, ": "); !r.Partial && files[file] != nil && !alive[key] {
			dead = append(dead, key)
		}
	}
	slices.Sort(dead)
	section("explained, but not alive", dead)
	return b.Flush()
}

// Unexplained is the number of mutants alive that the list does not explain.
func (r *Report) Unexplained(known Equivalents) (n int) {
	for _, v := range r.Alive() {
		if _, ok := known[v.key()]; !ok {
			n++
		}
	}
	return n
}

// key names a mutant apart from the line it stands in, which other changes
// move.
func (m *Mutant) key() string {
	return m.File + ": " + m.In + ": " + m.Before + " -> " + m.After
}

// Equivalents are the reasons why mutants cannot be killed, by mutant.
type Equivalents map[string]string

// ReadEquivalents reads a list of entries. The first line of each is a mutant,
//
//	file: function: before -> after
//
// and the indented lines that follow say why no test can tell it from
// the code. Empty lines, and lines that begin with #, are skipped.
func ReadEquivalents(r io.Reader) (Equivalents, error) {
	out := Equivalents{}
	var fresh []string // mutants that wait for their reason
	reason := ""
	settle := func() error {
		for _, key := range fresh {
			if reason == "" {
				return fmt.Errorf("no reason given for %q", key)
			}
			if _, twice := out[key]; twice {
				return fmt.Errorf("listed twice: %q", key)
			}
			out[key] = reason
		}
		fresh, reason = nil, ""
		return nil
	}
	lines := bufio.NewScanner(r)
	lines.Buffer(nil, 1<<20)
	for lines.Scan() {
		line := lines.Text()
		text := strings.TrimSpace(line)
		switch {
		case text == "" || strings.HasPrefix(line, "#"):
		case text != line && strings.HasPrefix(line, "\t"):
			if len(fresh) == 0 {
				return nil, fmt.Errorf("a reason without a mutant: %q", text)
			}
			reason = strings.TrimSpace(cmp.Or(reason, "") + " " + text)
		default:
			if reason != "" {
				if err := settle(); err != nil {
					return nil, err
				}
			}
			if !strings.Contains(line, " -> ") {
				return nil, fmt.Errorf("neither a mutant nor a reason: %q", line)
			}
			fresh = append(fresh, text)
		}
	}
	if err := lines.Err(); err != nil {
		return nil, err
	}
	return out, settle()
}
