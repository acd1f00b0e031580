package aci318

import (
	"context"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// The search finds tees in both senses in every edition, and what it finds stands
// up when it is judged again.
func TestDesignOfTees(t *testing.T) {
	floor := teeBrief()
	cantilever := hoggingTee(12, 30)
	cantilever.Section.FlangeThickness = in(5)
	cantilever.Loads = append(cantilever.Loads, beam.Load{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1)})
	fixed := teeBrief()
	fixed.Supports = []beam.Support{{Kind: statics.Fixed, Width: in(12)}, {Kind: statics.Fixed, Width: in(12)}}
	ledges := usBrief()
	ledges.Section = beam.Section{Shape: beam.InvertedTee, Width: in(14), Depth: in(26), FlangeThickness: in(8), FlangeWidth: in(26)}
	for name, b := range map[string]beam.Brief{"floor": floor, "cantilever": cantilever, "fixed": fixed, "ledges": ledges} {
		t.Run(name, func(t *testing.T) {
			for _, c := range []Code{ACI31819(), ACI31814()} {
				r, err := beam.Design(context.Background(), c, b)
				require.NoError(t, err)
				require.Empty(t, r.Refusals)
				for i := range r.Checks {
					require.NotEqual(t, beam.Fail, r.Checks[i].Outcome, "%s: %s %s", c.e.id, r.Checks[i].ID, r.Checks[i].Reason)
				}
				require.Equal(t, name != "floor", hasFlangeRow(r.Layout), "a flange in tension has bars beside the web")
				again, err := beam.CheckLayout(context.Background(), c, b, r.Layout)
				require.NoError(t, err)
				require.Equal(t, len(r.Checks), len(again.Checks))
				require.False(t, beam.Failing(again.Checks))
			}
		})
	}
}

func hasFlangeRow(l beam.Layout) bool {
	for i := range l.Longitudinal {
		if l.Longitudinal[i].Flange {
			return true
		}
	}
	return false
}
