// Package golden holds the output of the example programs against the files in
// testdata/examples. Only their tests use it.
package golden

import (
	"bytes"
	"flag"
	"io"
	"os"
	"testing"
)

var update = flag.Bool("update", false, "rewrite the golden file")

// Check runs a program and compares what it prints with the golden file of its
// name, which the flag -update writes first.
func Check(t *testing.T, name string, run func(io.Writer) error) {
	t.Helper()
	file := "../../testdata/examples/" + name + ".txt"
	var out bytes.Buffer
	if err := run(&out); err != nil {
		t.Fatal(err)
	}
	if *update {
		if err := os.WriteFile(file, out.Bytes(), 0o644); err != nil {
			t.Fatal(err)
		}
	}
	want, err := os.ReadFile(file)
	if err != nil {
		t.Fatal(err)
	}
	if !bytes.Equal(want, out.Bytes()) {
		t.Errorf("the output is not that of %s:\n%s", file, out.Bytes())
	}
}
