package beam_test

import (
	"context"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// Full single-span designs over every size of the catalog.
func BenchmarkDesign(b *testing.B) {
	heavy := plain()
	heavy.Loads[1].Intensity = units.KipPerFoot.Of(3.2)
	fixed := plain()
	fixed.Supports[0].Kind, fixed.Supports[1].Kind = statics.Fixed, statics.Fixed
	doubly := plain()
	doubly.Section.Depth = units.Inch.Of(18)
	doubly.Loads[1].Intensity = units.KipPerFoot.Of(1.9)
	uplift := plain()
	uplift.Loads = append(uplift.Loads, beam.Load{Case: beam.Wind, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(-2.5)})
	tee := hogging()
	tee.Spans[0] = units.Foot.Of(30)
	tee.Supports = fixed.Supports
	twisted := plain()
	twisted.Loads = append(twisted.Loads, beam.Load{Case: beam.Dead, Shape: beam.UniformTorque, Moment: units.KipFoot.Of(40)})
	for _, bb := range []struct {
		name  string
		brief beam.Brief
	}{
		{"ordinary", plain()}, {"two layers", heavy}, {"fixed ends", fixed}, {"compression steel", doubly}, {"uplift", uplift},
		{"hogging tee", tee}, {"torque", twisted},
	} {
		b.Run(bb.name, func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				r, err := beam.Design(context.Background(), aci318.ACI31819(), bb.brief)
				require.NoError(b, err)
				require.Equal(b, beam.Satisfied, r.Verdict)
			}
		})
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
