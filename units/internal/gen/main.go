// Gen writes the generated files of package units from the table in table.go.
//
// Usage, from the directory of package units:
//
//	go run ./internal/gen          write the files
//	go run ./internal/gen -check   write nothing; fail if a file is stale
package main

import (
	"bytes"
	"errors"
	"flag"
	"fmt"
	"os"
	"path/filepath"
	"slices"
)

func main() {
	check := flag.Bool("check", false, "write nothing; fail if a file is stale")
	flag.Parse()
	if err := run(".", *check); err != nil {
		fmt.Fprintln(os.Stderr, "gen:", err)
		os.Exit(1)
	}
}

// run brings the generated files in dir up to date, or with check reports
// those that are not.
func run(dir string, check bool) error {
	files, err := generate(catalog)
	if err != nil {
		return err
	}
	if !check {
		for name, want := range files {
			if err := os.WriteFile(filepath.Join(dir, name), want, 0o666); err != nil {
				return err
			}
		}
	}
	return stale(dir, files)
}

// stale reports each file of dir that differs from files, is missing, or is
// generated and no longer among them.
func stale(dir string, files map[string][]byte) error {
	var errs []error
	for name, want := range files {
		got, err := os.ReadFile(filepath.Join(dir, name))
		switch {
		case err != nil:
			errs = append(errs, err)
		case !bytes.Equal(got, want):
			errs = append(errs, fmt.Errorf("%s is stale; run go generate", name))
		}
	}
	for _, pattern := range []string{"*_gen.go", "*_gen_test.go"} {
		present, err := filepath.Glob(filepath.Join(dir, pattern))
		if err != nil {
			return err
		}
		for _, path := range present {
			if _, ok := files[filepath.Base(path)]; !ok {
				errs = append(errs, fmt.Errorf("%s is no longer generated; remove it", filepath.Base(path)))
			}
		}
	}
	slices.SortFunc(errs, func(a, b error) int { return bytes.Compare([]byte(a.Error()), []byte(b.Error())) })
	return errors.Join(errs...)
}
