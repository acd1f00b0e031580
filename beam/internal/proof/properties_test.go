package proof

import (
	"context"
	"encoding/json"
	"slices"
	"sync"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/beam"
	"soffit.example/beam/internal/briefs"
	"soffit.example/units"
)

// anySample draws a sample of any kind.
func anySample(t *rapid.T) briefs.Sample {
	return briefs.Random(seed+1, rapid.Uint64().Draw(t, "n"))
}

// designed draws a sample that has a result.
func designed(t *rapid.T) (briefs.Sample, *beam.Result) {
	s := anySample(t)
	r, err := beam.Design(context.Background(), codes[s.Code], s.Brief)
	if err != nil {
		t.Skip("input error")
	}
	return s, r
}

func marshal(t require.TestingT, v any) string {
	data, err := json.Marshal(v)
	require.NoError(t, err)
	return string(data)
}

// TestCheckAgrees puts every layout that Design returns to CheckLayout: the
// same checks, the same verdict.
func TestCheckAgrees(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s, r := designed(t)
		if r.Verdict == beam.OutOfScope || len(r.Layout.Longitudinal) == 0 {
			t.Skip("no layout")
		}
		b := s.Brief
		b = designedAs(b, r.Section.Depth)
		again, err := beam.CheckLayout(context.Background(), codes[s.Code], b, r.Layout)
		require.NoError(t, err)
		require.Equal(t, r.Verdict, again.Verdict)
		require.Equal(t, r.Checks, again.Checks)
		require.Equal(t, r.Bars, again.Bars)
		require.Equal(t, r.Schedule, again.Schedule)
		require.Equal(t, r.Quantities, again.Quantities)
		for _, a := range r.Alternatives {
			require.Equal(t, beam.Satisfied, r.Verdict, "alternatives of a beam that is not satisfied")
			b = designedAs(b, a.Depth)
			other, err := beam.CheckLayout(context.Background(), codes[s.Code], b, a.Layout)
			require.NoError(t, err)
			require.Equalf(t, beam.Satisfied, other.Verdict, "alternative: %v", other.Binding)
			require.Equal(t, a.Governing, other.Governing.ID)
			require.InEpsilon(t, other.Governing.Utilization, a.Utilization, 1e-9)
		}
		for _, j := range r.Rejected {
			require.NotEmpty(t, j.Failed)
			for i := range j.Failed {
				require.Equal(t, beam.Fail, j.Failed[i].Outcome)
			}
		}
	})
}

// TestSameBytes designs a brief again, and many times at once: the same
// bytes. The brief is left as it was.
func TestSameBytes(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s, r := designed(t)
		before, want := marshal(t, s.Brief), marshal(t, r)
		again := make([]*beam.Result, 4)
		var wg sync.WaitGroup
		for i := range again {
			wg.Go(func() { again[i], _ = beam.Design(context.Background(), codes[s.Code], s.Brief) })
		}
		wg.Wait()
		for _, a := range again {
			require.Equal(t, want, marshal(t, a))
		}
		require.Equal(t, before, marshal(t, s.Brief))
	})
}

// TestOtherUnits gives the same brief in other units. Conversions round, so
// that values may differ in their last digits, and nothing else.
func TestOtherUnits(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s, r := designed(t)
		b := converted(s.Brief)
		other, err := beam.Design(context.Background(), codes[s.Code], b)
		require.NoError(t, err)
		require.Equal(t, r.Verdict, other.Verdict)
		require.Equal(t, describeBars(r.Layout), describeBars(other.Layout))
		require.Equal(t, len(r.Checks), len(other.Checks))
		for i := range r.Checks {
			a, b := &r.Checks[i], &other.Checks[i]
			require.Equal(t, a.ID, b.ID)
			require.Equal(t, a.Outcome, b.Outcome, a.ID)
			require.InDeltaf(t, a.Utilization, b.Utilization, 1e-7*(1+a.Utilization), "%s", a.ID)
		}
	})
}

// converted expresses a brief in the other system's units.
func converted(b beam.Brief) beam.Brief {
	length := func(l units.Length) units.Length {
		return units.Foot.Of(units.Millimetre.Of(l.In(units.Millimetre)).In(units.Foot))
	}
	stress := func(s units.Stress) units.Stress {
		return units.KSI.Of(units.Megapascal.Of(s.In(units.Megapascal)).In(units.KSI))
	}
	x := &b.Section
	x.Width, x.Depth, x.FlangeThickness, x.FlangeWidth = length(x.Width), length(x.Depth), length(x.FlangeThickness), length(x.FlangeWidth)
	x.Slab = beam.Slab{ClearLeft: length(x.Slab.ClearLeft), ClearRight: length(x.Slab.ClearRight)}
	corners := func(of []beam.Point) []beam.Point {
		of = slices.Clone(of)
		for i := range of {
			of[i] = beam.Point{X: length(of[i].X), Y: length(of[i].Y)}
		}
		return of
	}
	x.Outline, x.Voids = corners(x.Outline), slices.Clone(x.Voids)
	for i := range x.Voids {
		x.Voids[i] = corners(x.Voids[i])
	}
	b.Concrete.Splitting = stress(b.Concrete.Splitting)
	b.Concrete.Strength = stress(b.Concrete.Strength)
	b.Reinforcement.Yield, b.Reinforcement.StirrupYield = stress(b.Reinforcement.Yield), stress(b.Reinforcement.StirrupYield)
	b.Concrete.Aggregate, b.Cover = length(b.Concrete.Aggregate), length(b.Cover)
	b.Spans, b.Supports = slices.Clone(b.Spans), slices.Clone(b.Supports)
	b.Loads, b.Demands = slices.Clone(b.Loads), slices.Clone(b.Demands)
	for i := range b.Spans {
		b.Spans[i] = length(b.Spans[i])
	}
	for i := range b.Supports {
		b.Supports[i].Width = length(b.Supports[i].Width)
	}
	for i := range b.Loads {
		l := &b.Loads[i]
		l.From, l.To, l.At = length(l.From), length(l.To), length(l.At)
		l.Intensity = units.KipPerFoot.Of(units.KilonewtonPerMetre.Of(l.Intensity.In(units.KilonewtonPerMetre)).In(units.KipPerFoot))
		l.IntensityEnd = units.KipPerFoot.Of(units.KilonewtonPerMetre.Of(l.IntensityEnd.In(units.KilonewtonPerMetre)).In(units.KipPerFoot))
		l.Force = units.Kip.Of(units.Kilonewton.Of(l.Force.In(units.Kilonewton)).In(units.Kip))
		l.Moment = units.KipFoot.Of(units.KilonewtonMetre.Of(l.Moment.In(units.KilonewtonMetre)).In(units.KipFoot))
	}
	for i := range b.Demands {
		d := &b.Demands[i]
		d.Moment = units.KipFoot.Of(units.KilonewtonMetre.Of(d.Moment.In(units.KilonewtonMetre)).In(units.KipFoot))
		d.Torque = units.KipFoot.Of(units.KilonewtonMetre.Of(d.Torque.In(units.KilonewtonMetre)).In(units.KipFoot))
		d.Shear = units.Kip.Of(units.Kilonewton.Of(d.Shear.In(units.Kilonewton)).In(units.Kip))
		d.Axial = units.Kip.Of(units.Kilonewton.Of(d.Axial.In(units.Kilonewton)).In(units.Kip))
	}
	return b
}

// describeBars says what lies where, without lengths that may round.
func describeBars(l beam.Layout) (out []beam.Row) {
	for _, r := range l.Longitudinal {
		out = append(out, beam.Row{Bar: r.Bar, Count: r.Count, Face: r.Face, Layer: r.Layer, InCompression: r.InCompression})
	}
	for _, z := range l.Transverse {
		out = append(out, beam.Row{Bar: z.Bar, Count: z.Count, Layer: z.Legs})
	}
	return out
}

// TestCloserStirrupsStillPass holds the search to what it rests on: closing
// up the stirrups of a beam that passes leaves it passing.
func TestCloserStirrupsStillPass(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s, r := designed(t)
		if r.Verdict != beam.Satisfied {
			t.Skip("not satisfied")
		}
		b := s.Brief
		b = designedAs(b, r.Section.Depth)
		l := r.Layout
		l.Transverse = slices.Clone(l.Transverse)
		for i := range l.Transverse {
			z := &l.Transverse[i]
			// Stirrups still stand clear of each other.
			closer := z.Spacing.Scale(rapid.Float64Range(0.2, 1).Draw(t, "closer"))
			z.Spacing, z.Count = closer.Max(z.Spacing.Min(units.Millimetre.Of(100))), 0
		}
		again, err := beam.CheckLayout(context.Background(), codes[s.Code], b, l)
		require.NoError(t, err)
		require.Equalf(t, beam.Satisfied, again.Verdict, "%v", again.Binding)
	})
}

// TestCuresCure reruns the changes that a failing beam's result suggests.
func TestCuresCure(t *testing.T) {
	cured, most := 0, 12
	if full() {
		most = 100
	}
	for n := uint64(0); n < 2000 && cured < most; n++ {
		s := briefs.Random(seed+2, n)
		if s.Kind != briefs.Sound && s.Kind != briefs.NoCapacity {
			continue
		}
		s.Brief.Preferences.NoCures = false
		r, err := beam.Design(context.Background(), codes[s.Code], s.Brief)
		require.NoError(t, err)
		if r.Verdict != beam.Unsatisfied {
			require.Empty(t, r.Cures)
			continue
		}
		for _, c := range r.Cures {
			b := s.Brief
			switch to := c.To; c.Change {
			case "depth":
				b.Section.Depth, _ = to.Length()
			case "width":
				b.Section.Width, _ = to.Length()
			case "concrete strength":
				b.Concrete.Strength, _ = to.Stress()
			default:
				require.Failf(t, "a cure of a kind that is not known", "%s", c.Change)
			}
			b.Preferences.Depths, b.Preferences.NoCures = nil, true
			again, err := beam.Design(context.Background(), codes[s.Code], b)
			require.NoError(t, err)
			require.Equalf(t, beam.Satisfied, again.Verdict, "brief %d with another %s: %v", n, c.Change, again.Binding)
			require.NotEmpty(t, c.Governing, "of the layout that was found to pass, which need not be the best")
			cured++
		}
	}
	require.GreaterOrEqual(t, cured, most)
}

// TestDepthsAreTried designs with a list of depths: satisfied if any of them
// alone is.
func TestDepthsAreTried(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		s := anySample(t)
		if s.Kind != briefs.Sound || s.Brief.Section.Shape == beam.Polygon {
			t.Skip("not sound, or of no other depth")
		}
		b := s.Brief
		b.Preferences.Depths = nil
		depths := []units.Length{b.Section.Depth}
		for range 2 {
			depths = append(depths, b.Section.Depth.Add(units.Inch.Of(float64(rapid.IntRange(1, 12).Draw(t, "inches")))))
		}
		any := false
		for _, d := range depths {
			one := b
			one.Section.Depth = d
			r, err := beam.Design(context.Background(), codes[s.Code], one)
			require.NoError(t, err)
			any = any || r.Verdict == beam.Satisfied
		}
		b.Preferences.Depths = depths[1:]
		r, err := beam.Design(context.Background(), codes[s.Code], b)
		require.NoError(t, err)
		require.Equalf(t, any, r.Verdict == beam.Satisfied, "depths %v, designed %v: %v", depths, r.Section.Depth, r.Binding)
	})
}
