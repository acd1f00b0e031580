package aci318

import (
	"slices"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// bare is a brief that leaves to the code all it may.
func bare() beam.Brief {
	return beam.Brief{
		Section:       beam.Section{Shape: beam.Rectangular, Width: in(14), Depth: in(24)},
		Concrete:      beam.Concrete{Strength: psi(4000)},
		Reinforcement: beam.Reinforcement{Catalog: "astm-inch", Yield: psi(60000)},
		Exposure:      beam.Interior,
		Spans:         []units.Length{units.Foot.Of(22)},
		Supports:      []beam.Support{{Kind: statics.Pinned}, {Kind: statics.Roller}},
		Loads:         []beam.Load{{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1)}},
	}
}

func TestResolveFillsWhatIsLeftToTheCode(t *testing.T) {
	for _, tc := range []struct {
		code      Code
		density   units.Density
		aggregate units.Length
	}{
		{ACI31819(), units.PoundPerCubicFoot.Of(150), in(0.75)},
		{ACI31814M(), units.KilogramPerCubicMetre.Of(2450), mm(20)},
	} {
		b := bare()
		var note beam.Register
		require.Empty(t, tc.code.Resolve(&b, &note))
		require.Equal(t, tc.density, b.Concrete.Density)
		require.Equal(t, tc.aggregate, b.Concrete.Aggregate)
		require.Equal(t, beam.Normalweight, b.Concrete.Kind)
		require.Equal(t, b.Reinforcement.Yield, b.Reinforcement.StirrupYield)
		require.Equal(t, beam.Uncoated, b.Reinforcement.Coating)
		require.Equal(t, beam.NothingAttached, b.Serviceability.Attached)
		require.Equal(t, 60, b.Serviceability.Months)
		require.Equal(t, beam.LargerRow, b.Readings.ShearRow)
		require.Equal(t, beam.SimplifiedShear, b.Readings.ShearMethod)
		ids := map[string]bool{}
		for _, a := range note.All() {
			require.NotEmpty(t, a.Assumed, a.ID)
			require.NotEmpty(t, a.UsedIn, a.ID)
			ids[a.ID] = true
		}
		for _, id := range []string{
			"concrete.kind", "concrete.density", "concrete.aggregate", "reinforcement.stirrup-yield", "reinforcement.coating",
			"bracing.compression-face", "serviceability.attached", "supports.width", "shear.direct-support",
			"reading.displaced-concrete", "reading.yield-strain", "reading.corner", assumeTensionControl,
		} {
			require.True(t, ids[id], id)
		}
		require.Equal(t, tc.code.e.shear.rowsByStirrups, ids["reading.shear-row"])
		require.Equal(t, tc.code.e.shear.rowsByStirrups, ids[assumeLeastStirrups])
		require.NotEqual(t, ids["reading.shear-row"], ids["reading.shear-method"])
	}
}

// Resolving twice changes nothing more, as a resolved brief has no gap.
func TestResolveIsIdempotent(t *testing.T) {
	b := bare()
	var note beam.Register
	require.Empty(t, ACI31819().Resolve(&b, &note))
	again := b
	require.Empty(t, ACI31819().Resolve(&again, &note))
	require.Equal(t, b, again)
}

func TestResolveFaults(t *testing.T) {
	pcf, kg := units.PoundPerCubicFoot.Of, units.KilogramPerCubicMetre.Of
	for _, tc := range []struct {
		name, path string
		code       Code
		edit       func(b *beam.Brief)
	}{
		{"neither exposure nor cover", "/exposure", ACI31819(), func(b *beam.Brief) { b.Exposure = 0 }},
		{"cover alone", "", ACI31819(), func(b *beam.Brief) { b.Exposure, b.Cover = 0, in(2) }},
		{"lightweight without density", "/concrete/density", ACI31819(), func(b *beam.Brief) { b.Concrete.Kind = beam.AllLightweight }},
		{"lightweight of 115", "", ACI31814(), func(b *beam.Brief) { b.Concrete.Kind, b.Concrete.Density = beam.SandLightweight, pcf(115) }},
		{"lightweight of 120 under 318-14", "/concrete/density", ACI31814(), func(b *beam.Brief) { b.Concrete.Kind, b.Concrete.Density = beam.SandLightweight, pcf(120) }},
		{"lightweight of 120 under 318-19", "", ACI31819(), func(b *beam.Brief) { b.Concrete.Kind, b.Concrete.Density = beam.SandLightweight, pcf(120) }},
		{"lightweight too light", "/concrete/density", ACI31819(), func(b *beam.Brief) { b.Concrete.Kind, b.Concrete.Density = beam.SandLightweight, pcf(89) }},
		{"normalweight too light", "/concrete/density", ACI31819(), func(b *beam.Brief) { b.Concrete.Density = pcf(134) }},
		{"normalweight of 160", "", ACI31819(), func(b *beam.Brief) { b.Concrete.Density = pcf(160) }},
		{"heavyweight", "/concrete/density", ACI31819(), func(b *beam.Brief) { b.Concrete.Density = pcf(161) }},
		{"kg/m3 in bounds", "", ACI31819M(), func(b *beam.Brief) { b.Concrete.Density = kg(2400) }},
		{"kg/m3 out of bounds", "/concrete/density", ACI31819M(), func(b *beam.Brief) { b.Concrete.Density = kg(2570) }},
	} {
		t.Run(tc.name, func(t *testing.T) {
			b := bare()
			tc.edit(&b)
			var note beam.Register
			faults := tc.code.Resolve(&b, &note)
			if tc.path == "" {
				require.Empty(t, faults)
				return
			}
			require.Len(t, faults, 1)
			require.Equal(t, tc.path, faults[0].Path)
			require.NotEmpty(t, faults[0].Detail)
			require.NotEmpty(t, faults[0].Allowed)
		})
	}
}

func TestResolveSaysWhatItDecides(t *testing.T) {
	said := func(edit func(b *beam.Brief)) map[string]beam.Assumption {
		b := bare()
		edit(&b)
		var note beam.Register
		require.Empty(t, ACI31819().Resolve(&b, &note))
		out := map[string]beam.Assumption{}
		for _, a := range note.All() {
			out[a.ID] = a
		}
		return out
	}
	a := said(func(b *beam.Brief) { b.Reinforcement.StirrupYield = psi(80000) })
	require.Contains(t, a["reinforcement.stirrup-yield-cap"].Assumed, "60000 psi of their 80000 psi")
	a = said(func(b *beam.Brief) { b.Readings.RoundedYield = true })
	require.Contains(t, a["reading.yield-strain"].Assumed, "0.002")
	a = said(func(b *beam.Brief) { b.Readings.RoundedYield, b.Reinforcement.Yield = true, psi(80000) })
	require.Contains(t, a["reading.yield-strain"].Assumed, "Grade 60 only")
	a = said(func(b *beam.Brief) { b.Loads = append(b.Loads, beam.Load{Case: beam.Snow}) })
	require.Contains(t, a, "loads.live-factor")
	a = said(func(b *beam.Brief) { b.Loads[0].Hung = true })
	require.NotContains(t, a, "shear.direct-support")
	a = said(func(b *beam.Brief) {
		b.Spans, b.Supports, b.Loads, b.Demands = nil, nil, nil, []beam.Demand{{Name: "1", Moment: units.KipFoot.Of(1)}}
	})
	require.Contains(t, a, "demands.factored")
	require.NotContains(t, a, "supports.width")
}

func TestCautionsDeferToTheEngineer(t *testing.T) {
	for _, c := range Editions() {
		require.Contains(t, c.Cautions()[0], "licensed engineer")
		require.Contains(t, c.Cautions()[1], c.e.title)
	}
}

// Which assumptions of exposure, loads, demands and supports a brief brings, by
// id: what is listed is what was taken for granted, and no more.
func TestAssumptionsOfABrief(t *testing.T) {
	spans := []string{"supports.width", "shear.direct-support"}
	uniform := func(c beam.LoadCase) beam.Load {
		return beam.Load{Case: c, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1)}
	}
	loads := func(list ...beam.Load) func(*beam.Brief) {
		return func(b *beam.Brief) { b.Loads = list }
	}
	demands := func(list ...beam.Demand) func(*beam.Brief) {
		return func(b *beam.Brief) { b.Spans, b.Supports, b.Loads, b.Demands = nil, nil, nil, list }
	}
	moment, shear := beam.Demand{Name: "1", Moment: units.KipFoot.Of(1)}, beam.Demand{Name: "2", Shear: units.Kip.Of(1)}
	for _, tc := range []struct {
		name string
		edit func(*beam.Brief)
		more []string // beside those of spans
	}{
		{"live load", func(*beam.Brief) {}, []string{"loads.live"}},
		{"no load", loads(), []string{"loads.none"}},
		{"dead load", loads(uniform(beam.Dead)), nil},
		{"dead load that holds the weight", func(b *beam.Brief) { b.NoSelfWeight = true; b.Loads[0].Case = beam.Dead }, []string{"loads.self-weight"}},
		{"wind", loads(uniform(beam.Wind)), []string{"loads.wind", "loads.reversal"}},
		{"earthquake", loads(uniform(beam.Earthquake)), []string{"loads.reversal"}},
		{"wind, and dead load after it", loads(uniform(beam.Wind), uniform(beam.Dead)), []string{"loads.wind", "loads.reversal"}},
		{"snow", loads(uniform(beam.Snow)), nil},
		{"live and snow", loads(uniform(beam.Live), uniform(beam.Snow)), []string{"loads.live", "loads.live-factor"}},
		{"live and earthquake", loads(uniform(beam.Live), uniform(beam.Earthquake)), []string{"loads.live", "loads.reversal", "loads.live-factor"}},
		{"two live loads", loads(uniform(beam.Live), uniform(beam.Live)), []string{"loads.live"}},
		{"a torque, and dead load after it", loads(beam.Load{Case: beam.Dead, Shape: beam.Torque}, uniform(beam.Dead)), []string{"supports.torsion"}},
		{"a torque along the span", loads(beam.Load{Case: beam.Dead, Shape: beam.UniformTorque}), []string{"supports.torsion"}},
		{"a fixed end", func(b *beam.Brief) { b.Supports[1].Kind = statics.Fixed }, []string{"loads.live", "supports.fixity"}},
	} {
		t.Run(tc.name, func(t *testing.T) {
			b := bare()
			tc.edit(&b)
			require.ElementsMatch(t, append(tc.more, spans...), assumed(t, ACI31819(), b))
		})
	}
	for _, tc := range []struct {
		name string
		edit func(*beam.Brief)
		more []string
	}{
		{"moments alone", demands(moment), []string{"demands.shear", "demands.factored"}},
		{"shear in one of the demands", demands(shear, moment), []string{"demands.factored"}},
		{"supports of stated width", func(b *beam.Brief) { b.Supports[0].Width, b.Supports[1].Width = in(12), in(12) }, []string{"loads.live", "shear.direct-support"}},
		{"a free end has no face", func(b *beam.Brief) {
			b.Supports = []beam.Support{{Kind: statics.Fixed, Width: in(12)}, {Kind: statics.Free}}
		}, []string{"loads.live", "supports.fixity", "shear.direct-support"}},
		{"a hung support", func(b *beam.Brief) { b.Supports[0].Hung = true }, []string{"loads.live", "supports.width"}},
		{"a hung load, and one that is not", func(b *beam.Brief) {
			b.Loads = []beam.Load{uniform(beam.Dead), uniform(beam.Dead)}
			b.Loads[0].Hung = true
		}, []string{"supports.width"}},
		{"cover alone", func(b *beam.Brief) { b.Exposure, b.Cover = 0, in(2) }, []string{"exposure.class", "loads.live", "supports.width", "shear.direct-support"}},
	} {
		t.Run(tc.name, func(t *testing.T) {
			b := bare()
			tc.edit(&b)
			require.ElementsMatch(t, tc.more, assumed(t, ACI31819(), b))
		})
	}
	b := bare()
	b.Exposure, b.Cover = 0, in(2)
	var note beam.Register
	require.Empty(t, ACI31819().Resolve(&b, &note))
	require.Equal(t, beam.Interior, b.Exposure)
}

// assumed are the ids of what a brief brings of exposure, loads, demands and
// supports.
func assumed(t *testing.T, c Code, b beam.Brief) []string {
	t.Helper()
	var note beam.Register
	require.Empty(t, c.Resolve(&b, &note))
	var ids []string
	for _, a := range note.All() {
		topic, _, _ := strings.Cut(a.ID, ".")
		if slices.Contains([]string{"exposure", "loads", "demands", "supports"}, topic) || a.ID == "shear.direct-support" {
			ids = append(ids, a.ID)
		}
	}
	return ids
}

// The readings that the brief chooses are listed as they were chosen.
func TestReadingsInWords(t *testing.T) {
	words := func(edit func(b *beam.Brief)) map[string]string {
		b := bare()
		edit(&b)
		var note beam.Register
		require.Empty(t, ACI31819().Resolve(&b, &note))
		out := map[string]string{}
		for _, a := range note.All() {
			out[a.ID] = a.Assumed
		}
		return out
	}
	usual := words(func(*beam.Brief) {})
	require.Equal(t, "the concrete that compression bars displace is deducted", usual["reading.displaced-concrete"])
	require.Contains(t, usual["reading.corner"], "tangent point")
	other := words(func(b *beam.Brief) { b.Readings.IgnoreDisplaced, b.Readings.TuckedCorner = true, true })
	require.Equal(t, "the concrete that compression bars displace is not deducted", other["reading.displaced-concrete"])
	require.Contains(t, other["reading.corner"], "pushed into")
}
