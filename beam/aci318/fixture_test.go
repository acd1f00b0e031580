package aci318

import (
	"context"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// usBrief is a simply supported rectangle of our own, 14 by 24 in over 22 ft.
func usBrief() beam.Brief {
	return beam.Brief{
		Section:       beam.Section{Shape: beam.Rectangular, Width: units.Inch.Of(14), Depth: units.Inch.Of(24)},
		Concrete:      beam.Concrete{Strength: units.PSI.Of(4000)},
		Reinforcement: beam.Reinforcement{Catalog: "astm-inch", Yield: units.KSI.Of(60)},
		Exposure:      beam.Interior,
		Spans:         []units.Length{units.Foot.Of(22)},
		Supports:      []beam.Support{{Kind: statics.Pinned, Width: units.Inch.Of(12)}, {Kind: statics.Roller, Width: units.Inch.Of(12)}},
		Loads: []beam.Load{
			{Case: beam.Dead, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(1.1)},
			{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(2.3)},
		},
	}
}

// demandBrief is the same section under demands given directly.
func demandBrief(demands ...beam.Demand) beam.Brief {
	b := usBrief()
	b.Spans, b.Supports, b.Loads = nil, nil, nil
	b.Demands = demands
	return b
}

// problemOf resolves and analyses a brief. The layout put in is of no account.
func problemOf(t testing.TB, c Code, b beam.Brief) *beam.Problem {
	t.Helper()
	catalog, err := bars.Lookup(b.Reinforcement.Catalog)
	require.NoError(t, err)
	r, err := beam.CheckLayout(context.Background(), c, b, beam.Layout{Longitudinal: []beam.Row{
		{Bar: catalog.At(5).Name, Count: 2, Face: beam.Bottom, Layer: 1},
		{Bar: catalog.At(5).Name, Count: 2, Face: beam.Top, Layer: 1},
	}})
	require.NoError(t, err)
	require.Empty(t, r.Refusals)
	return r.Problem
}

// refusalsOf are the refusals of a brief, by rule.
func refusalsOf(t testing.TB, c Code, b beam.Brief) map[string]beam.Refusal {
	t.Helper()
	r, err := beam.CheckLayout(context.Background(), c, b, beam.Layout{Longitudinal: []beam.Row{
		{Bar: "#8", Count: 2, Face: beam.Bottom, Layer: 1}, {Bar: "#8", Count: 2, Face: beam.Top, Layer: 1},
	}})
	require.NoError(t, err)
	out := map[string]beam.Refusal{}
	for _, x := range r.Refusals {
		out[x.Rule] = x
	}
	return out
}

// group is a number of bars in one layer; more than one group stacks layers.
type group struct {
	n    int
	size string
}

// trialOf lays bars inside stirrups of a size, without zones.
func trialOf(t testing.TB, p *beam.Problem, tie string, bottom, top []group) *beam.Trial {
	t.Helper()
	tr := &beam.Trial{Problem: p}
	var err error
	if tie != "" {
		tr.Stirrup, err = p.Catalog.Size(tie)
		require.NoError(t, err)
	}
	var largest bars.Size
	layers := map[beam.Face][]bars.Layer{}
	for face, groups := range map[beam.Face][]group{beam.Bottom: bottom, beam.Top: top} {
		for _, g := range groups {
			s, err := p.Catalog.Size(g.size)
			require.NoError(t, err)
			if largest.Diameter.Less(s.Diameter) {
				largest = s
			}
			layers[face] = append(layers[face], bars.Layer{{Size: s, Count: g.n}})
		}
	}
	tr.Cover = p.Code.Cover(p, tr.Stirrup, largest)
	for _, face := range []beam.Face{beam.Bottom, beam.Top} {
		f := tr.Steel(face)
		f.Face = face
		if len(layers[face]) == 0 {
			continue
		}
		cage := bars.Cage{
			Width: p.Brief.Section.Width, Depth: p.Brief.Section.Depth,
			SideCover: tr.Cover, FaceCover: tr.Cover, Stirrup: tr.Stirrup,
		}
		require.NoError(t, f.Fit.Lay(&cage, layers[face], p.Code.Gaps(p)))
		f.Area, f.Centroid, f.Count = f.Fit.Area, f.Fit.Centroid, len(f.Fit.Bars)
		f.Nearest = f.Fit.Bars[0].Y
		f.Largest, f.Smallest = f.Fit.Bars[0].Size, f.Fit.Bars[0].Size
		for i := range f.Fit.Bars {
			s := f.Fit.Bars[i].Size
			if f.Fit.Layers[f.Fit.Bars[i].Layer-1].Count > 1 {
				f.Farthest = f.Farthest.Max(f.Fit.Bars[i].Y)
			}
			if f.Largest.Diameter.Less(s.Diameter) {
				f.Largest = s
			}
			if s.Diameter.Less(f.Smallest.Diameter) {
				f.Smallest = s
			}
		}
	}
	return tr
}

// addZone puts stirrups of the trial's size over a length in inches.
func addZone(tr *beam.Trial, legs int, spacing, from, to float64) {
	z := beam.Zone{Span: 1, Bar: tr.Stirrup.Name, Legs: legs, Spacing: units.Inch.Of(spacing), Form: "closed"}
	if tr.Forces.Spans() == 0 {
		z.Span = 0
	} else {
		z.From, z.To = units.Inch.Of(from), units.Inch.Of(to)
		z.Count = int((to-from)/spacing + 1 - 1e-9)
	}
	tr.Zones = append(tr.Zones, z)
	tr.ZoneBar = append(tr.ZoneBar, tr.Stirrup)
}

// checksOf gives the checks of an id.
func checksOf(checks []beam.Check, id string) []beam.Check {
	var out []beam.Check
	for _, c := range checks {
		if c.ID == id {
			out = append(out, c)
		}
	}
	return out
}

// only gives the one check of an id.
func only(t testing.TB, checks []beam.Check, id string) beam.Check {
	t.Helper()
	found := checksOf(checks, id)
	require.Len(t, found, 1, id)
	return found[0]
}

// valueIn reads an amount in a unit.
func valueIn(t testing.TB, a units.Amount, unit string) float64 {
	t.Helper()
	v, err := a.In(unit)
	require.NoError(t, err)
	return v
}

// flexureStrength is the full account of a section's strength in bending, least steel
// among it.
// Layers are measured from the top face, whichever the sense.
func (e *edition) flexureStrength(section mechanics.Section, strength units.Stress, s beam.Sense, r *beam.Readings) (beam.FlexureStrength, error) {
	f, _, err := e.flexureUnder(section, strength, s, r, units.Force{})
	if err != nil {
		return f, err
	}
	yield := section.Layers[0].Steel.Yield
	for _, l := range section.Layers {
		yield = yield.Min(l.Steel.Yield)
	}
	m := e.minimumSteel(strength, yield, e.minimumWidth(webWidth(section), tensionWidth(section, s), true), f.EffectiveDepth)
	f.MinimumSteel = e.areaOf(m.area)
	return f, nil
}

// webWidth is the least width of the section, by which least steel is measured.
func webWidth(section mechanics.Section) units.Length {
	least := section.Parts[0].Width
	for _, p := range section.Parts {
		top, bottom := p.Widths()
		least = least.Min(top).Min(bottom)
	}
	return least
}

// tensionWidth is the width of the tension face.
func tensionWidth(section mechanics.Section, s beam.Sense) units.Length {
	if s == beam.Negative {
		top, _ := section.Parts[0].Widths()
		return top
	}
	_, bottom := section.Parts[len(section.Parts)-1].Widths()
	return bottom
}
