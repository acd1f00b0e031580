package beam_test

import (
	"context"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
)

// A full single-span design over every size of the catalog.
func BenchmarkDesign(b *testing.B) {
	brief, code := plain(), aci318.ACI31819()
	b.ReportAllocs()
	for b.Loop() {
		r, err := beam.Design(context.Background(), code, brief)
		require.NoError(b, err)
		require.Equal(b, beam.Satisfied, r.Verdict)
	}
}

func BenchmarkCheckLayout(b *testing.B) {
	brief, code := plain(), aci318.ACI31819()
	r, err := beam.Design(context.Background(), code, brief)
	require.NoError(b, err)
	b.ReportAllocs()
	for b.Loop() {
		_, err := beam.CheckLayout(context.Background(), code, brief, r.Layout)
		require.NoError(b, err)
	}
}
