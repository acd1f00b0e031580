// Command mutate measures how well the tests of a package hold its code; see
// package mutation.
//
//	go run ./beam/internal/mutation/mutate -pkg ./beam/mechanics
//
// It ends with status 1 if fewer mutants are killed than the threshold asks.
package main

import (
	"context"
	"flag"
	"fmt"
	"os"
	"os/signal"
	"regexp"
	"runtime"
	"strconv"
	"strings"

	"soffit.example/beam/internal/mutation"
)

func main() {
	enough, err := run()
	if err != nil {
		fmt.Fprintln(os.Stderr, "mutate:", err)
		os.Exit(2)
	}
	if !enough {
		os.Exit(1)
	}
}

func run() (enough bool, err error) {
	var o mutation.Options
	flag.StringVar(&o.Package, "pkg", "", "the `package`, as the go command takes it")
	files := flag.String("files", "", "mutate only files whose names match this `regexp`")
	only := flag.String("run-only", "", "run only the mutants of these `numbers`, divided by commas; prints what kills them")
	flag.IntVar(&o.Sample, "sample", 0, "run this `many` mutants, drawn by -seed; 0 for all")
	flag.Uint64Var(&o.Seed, "seed", 1, "of the sample")
	flag.IntVar(&o.Jobs, "jobs", runtime.NumCPU(), "processes at once")
	flag.Float64Var(&o.Patience, "patience", 8, "a run may last so many `times` its clean time, and two seconds")
	flag.IntVar(&o.Checks, "checks", 25, "asked of a property in the first round")
	flag.BoolVar(&o.Long, "long", false, "run the tests without -test.short")
	flag.BoolVar(&o.Quick, "quick", false, "leave out the second round, in which properties make all their checks")
	list := flag.Bool("list", false, "list the mutants and run none")
	killers := flag.Bool("killers", false, "print the test that killed each mutant")
	threshold := flag.Float64("threshold", 95, "least `percent` of mutants killed")
	equivalents := flag.String("equivalents", "", "a `file` of mutants that cannot be killed, with reasons")
	flag.Parse()
	if o.Package == "" || flag.NArg() > 0 {
		flag.Usage()
		return false, fmt.Errorf("-pkg is needed, and no other arguments")
	}
	if *files != "" {
		if o.Files, err = regexp.Compile(*files); err != nil {
			return false, fmt.Errorf("-files: %w", err)
		}
	}
	for _, field := range strings.FieldsFunc(*only, func(r rune) bool { return r == ',' }) {
		id, err := strconv.Atoi(field)
		if err != nil {
			return false, fmt.Errorf("-run-only: %w", err)
		}
		o.Only = append(o.Only, id)
		o.Output = os.Stdout
	}
	known := mutation.Equivalents{}
	if *equivalents != "" {
		f, err := os.Open(*equivalents)
		if err != nil {
			return false, err
		}
		defer f.Close()
		if known, err = mutation.ReadEquivalents(f); err != nil {
			return false, fmt.Errorf("%s: %w", *equivalents, err)
		}
	}
	if *list {
		mutants, err := mutation.List(o)
		for _, m := range mutants {
			fmt.Println(m.ID, m)
		}
		return err == nil, err
	}
	o.Progress = os.Stderr
	ctx, stop := signal.NotifyContext(context.Background(), os.Interrupt)
	defer stop()
	report, err := mutation.Run(ctx, o)
	if err != nil {
		return false, err
	}
	if *killers {
		for _, v := range report.Verdicts {
			fmt.Printf("%d %s: %s by %s\n", v.ID, v.Mutant, v.Outcome, v.By)
		}
	}
	if err := report.Write(os.Stdout, known); err != nil {
		return false, err
	}
	return report.Counts().Rate() >= *threshold, nil
}
