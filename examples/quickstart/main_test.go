package main

import (
	"testing"

	"soffit.example/examples/internal/golden"
)

func TestOutput(t *testing.T) { golden.Check(t, "quickstart", run) }
