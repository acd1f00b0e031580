package beam_test

import (
	"context"
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// plain is a brief without fault, of an invented beam.
func plain() beam.Brief {
	return beam.Brief{
		Section:       beam.Section{Shape: beam.Rectangular, Width: units.Inch.Of(14), Depth: units.Inch.Of(24)},
		Concrete:      beam.Concrete{Strength: units.PSI.Of(4000)},
		Reinforcement: beam.Reinforcement{Catalog: "astm-inch", Yield: units.KSI.Of(60)},
		Exposure:      beam.Interior,
		Spans:         []units.Length{units.Foot.Of(22)},
		Supports:      []beam.Support{{Kind: statics.Pinned, Width: units.Inch.Of(12)}, {Kind: statics.Roller, Width: units.Inch.Of(12)}},
		Loads: []beam.Load{
			{Case: beam.Dead, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1.1)},
			{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1.3)},
		},
	}
}

// Every fault names its field by pointer, says the value and what would do.
func TestFaultsOfABrief(t *testing.T) {
	tests := []struct {
		name string
		edit func(b *beam.Brief)
		path string
		says string
	}{
		{"no shape", func(b *beam.Brief) { b.Section.Shape = 0 }, "/section/shape", ""},
		{"zero width", func(b *beam.Brief) { b.Section.Width = units.Length{} }, "/section/width", "0 in"},
		{"negative depth", func(b *beam.Brief) { b.Section.Depth = units.Inch.Of(-3) }, "/section/depth", "-3 in"},
		{"depth not a number", func(b *beam.Brief) { b.Section.Depth = units.Inch.Of(math.NaN()) }, "/section/depth", "not a finite number"},
		{"infinite width", func(b *beam.Brief) { b.Section.Width = units.Inch.Of(math.Inf(1)) }, "/section/width", "not a finite number"},
		{"feet for inches", func(b *beam.Brief) { b.Section.Width = units.Foot.Of(140) }, "/section/width", "1680 in"},
		{"no concrete strength", func(b *beam.Brief) { b.Concrete.Strength = units.Stress{} }, "/concrete/strength", "0 ksi"},
		{"ksi for psi", func(b *beam.Brief) { b.Concrete.Strength = units.KSI.Of(4000) }, "/concrete/strength", "4000 ksi"},
		{"feathers", func(b *beam.Brief) { b.Concrete.Density = units.PoundPerCubicFoot.Of(2) }, "/concrete/density", "2 lb/ft3"},
		{"unknown kind", func(b *beam.Brief) { b.Concrete.Kind = 9 }, "/concrete/kind", ""},
		{"negative aggregate", func(b *beam.Brief) { b.Concrete.Aggregate = units.Inch.Of(-1) }, "/concrete/aggregate", "-1 in"},
		{"no yield", func(b *beam.Brief) { b.Reinforcement.Yield = units.Stress{} }, "/reinforcement/yield", "0 ksi"},
		{"soft stirrups", func(b *beam.Brief) { b.Reinforcement.StirrupYield = units.PSI.Of(60) }, "/reinforcement/stirrup_yield", "0.06 ksi"},
		{"unknown catalog", func(b *beam.Brief) { b.Reinforcement.Catalog = "astm" }, "/reinforcement/catalog", "astm"},
		{"unknown coating", func(b *beam.Brief) { b.Reinforcement.Coating = 7 }, "/reinforcement/coating", ""},
		{"unknown exposure", func(b *beam.Brief) { b.Exposure = 7 }, "/exposure", ""},
		{"cover as wide as the beam", func(b *beam.Brief) { b.Cover = units.Inch.Of(7) }, "/cover", "7 in"},
		{"nothing to carry it", func(b *beam.Brief) { b.Supports = nil }, "/supports", "0 supports"},
		{"three supports", func(b *beam.Brief) { b.Supports = append(b.Supports, b.Supports[0]) }, "/supports", "3 supports"},
		{"unknown support", func(b *beam.Brief) { b.Supports[1].Kind = 0 }, "/supports/1/kind", ""},
		{"wide support", func(b *beam.Brief) { b.Supports[0].Width = units.Foot.Of(12) }, "/supports/0/width", "144 in"},
		{"wide free end", func(b *beam.Brief) {
			b.Supports[0].Kind = statics.Fixed
			b.Supports[1].Kind = statics.Free
		}, "/supports/1/width", "12 in"},
		{"mechanism", func(b *beam.Brief) { b.Supports[1] = beam.Support{Kind: statics.Free} }, "/supports", "turns about support 1"},
		{"no span", func(b *beam.Brief) { b.Spans = nil }, "/spans", "missing"},
		{"two spans", func(b *beam.Brief) { b.Spans = append(b.Spans, b.Spans[0]) }, "/spans", "2 spans"},
		{"short span", func(b *beam.Brief) { b.Spans[0] = units.Inch.Of(1) }, "/spans/0", "1 in"},
		{"no load at all", func(b *beam.Brief) { b.Loads, b.NoSelfWeight = nil, true }, "/loads", "no load"},
		{"no case", func(b *beam.Brief) { b.Loads[0].Case = 0 }, "/loads/0/case", ""},
		{"no load shape", func(b *beam.Brief) { b.Loads[1].Shape = 0 }, "/loads/1/shape", ""},
		{"second span of one", func(b *beam.Brief) { b.Loads[1].Span = 2 }, "/loads/1/span", "2"},
		{"sustained above one", func(b *beam.Brief) { b.Loads[1].Sustained = 1.2 }, "/loads/1/sustained", "1.2"},
		{"load off the beam", func(b *beam.Brief) {
			b.Loads[0] = beam.Load{Case: beam.Dead, Shape: beam.PointLoad, At: units.Foot.Of(23), Force: units.Kip.Of(1)}
		}, "/loads/0/at", "276 in"},
		{"backward partial load", func(b *beam.Brief) {
			b.Loads[0] = beam.Load{Case: beam.Dead, Shape: beam.Partial, From: units.Foot.Of(8), To: units.Foot.Of(4), Intensity: units.KipPerFoot.Of(1)}
		}, "/loads/0/to", "48 in"},
		{"absurd load", func(b *beam.Brief) { b.Loads[0].Intensity = units.KipPerFoot.Of(1e9) }, "/loads/0/intensity", "kip/ft"},
		{"load not a number", func(b *beam.Brief) { b.Loads[0].Intensity = units.KipPerFoot.Of(math.NaN()) }, "/loads/0/intensity", "not a finite number"},
		{"spans and demands", func(b *beam.Brief) { b.Demands = []beam.Demand{{Name: "A"}} }, "/demands", "not both"},
		{"unknown bar", func(b *beam.Brief) { b.Preferences.Bars = []string{"#12"} }, "/preferences/bars/0", "#12"},
		{"bar twice", func(b *beam.Brief) { b.Preferences.Bars = []string{"#8", "#8"} }, "/preferences/bars/1", "twice"},
		{"unknown stirrup", func(b *beam.Brief) { b.Preferences.Stirrups = []string{"No. 3"} }, "/preferences/stirrups/0", "No. 3"},
		{"stirrups too thick to bend", func(b *beam.Brief) { b.Preferences.Stirrups = []string{"#9"} }, "/preferences/stirrups/0", "#9"},
		{"nine layers", func(b *beam.Brief) { b.Preferences.MaxLayers = 9 }, "/preferences/max_layers", "9"},
		{"one leg", func(b *beam.Brief) { b.Preferences.MaxLegs = 1 }, "/preferences/max_legs", "1"},
		{"two zones", func(b *beam.Brief) { b.Preferences.MaxZones = 2 }, "/preferences/max_zones", "2"},
		{"flat depth", func(b *beam.Brief) { b.Preferences.Depths = []units.Length{units.Inch.Of(0.1)} }, "/preferences/depths/0", "0.1 in"},
		{"unknown preference", func(b *beam.Brief) { b.Preferences.Prefer = 11 }, "/preferences/prefer", ""},
		{"unknown reading", func(b *beam.Brief) { b.Readings.ShearRow = 5 }, "/shear_row", ""},
		{"months", func(b *beam.Brief) { b.Serviceability.Months = -1 }, "/serviceability/months", "-1"},
		{"unbraced by nothing", func(b *beam.Brief) { b.Braced = units.Inch.Of(-1) }, "/braced", "-1 in"},
	}
	for _, tt := range tests {
		t.Run(tt.name, func(t *testing.T) {
			b := plain()
			tt.edit(&b)
			_, err := beam.Design(context.Background(), aci318.ACI31819(), b)
			var input *beam.InputError
			require.ErrorAs(t, err, &input)
			require.Len(t, input.Faults, 1, "%v", err)
			require.Equal(t, tt.path, input.Faults[0].Path)
			require.Contains(t, input.Faults[0].Detail, tt.says)
			require.NotContains(t, input.Faults[0].Detail, "NaN")
		})
	}
}

func TestEveryFaultAtOnce(t *testing.T) {
	b := plain()
	b.Section.Width = units.Length{}
	b.Concrete.Strength = units.Stress{}
	b.Loads[1].Sustained = -1
	_, err := beam.Design(context.Background(), aci318.ACI31819(), b)
	var input *beam.InputError
	require.ErrorAs(t, err, &input)
	require.Len(t, input.Faults, 3)
	require.Contains(t, err.Error(), "3 faults")
}
