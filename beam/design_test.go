package beam_test

import (
	"context"
	"encoding/json"
	"slices"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

func design(t *testing.T, b beam.Brief) *beam.Result {
	t.Helper()
	r, err := beam.Design(context.Background(), aci318.ACI31819(), b)
	require.NoError(t, err)
	return r
}

func failures(r *beam.Result) []string {
	var out []string
	for i := range r.Checks {
		if r.Checks[i].Outcome == beam.Fail {
			out = append(out, r.Checks[i].Describe(r.System))
		}
	}
	return out
}

func TestDesignOfAnOrdinaryBeam(t *testing.T) {
	r := design(t, plain())
	require.Equal(t, beam.Satisfied, r.Verdict, failures(r))
	require.NotNil(t, r.Governing)
	require.False(t, r.Governing.Detailing)
	require.NotEmpty(t, r.Rejected)
	for _, rej := range r.Rejected {
		require.NotEmpty(t, rej.Failed)
	}
	require.NotEmpty(t, r.Alternatives)
	require.NotEmpty(t, r.Cautions)
	require.Empty(t, r.Cures)
	for _, id := range []string{"development.anchorage", "cutoff.extension", "seismic.detailing"} {
		i := slices.IndexFunc(r.Checks, func(c beam.Check) bool { return c.ID == id })
		require.GreaterOrEqual(t, i, 0, id)
		require.Equal(t, beam.NotJudged, r.Checks[i].Outcome)
		require.True(t, slices.ContainsFunc(r.Cautions, func(c string) bool { return strings.Contains(c, id) }), "%s is not among the cautions", id)
	}
}

// Compression steel appears where no tension steel alone can do, and only
// there; its bars are tied.
func TestCompressionSteelWhereNothingElseDoes(t *testing.T) {
	b := plain()
	b.Section = beam.Section{Shape: beam.Rectangular, Width: units.Inch.Of(12), Depth: units.Inch.Of(20)}
	b.Spans[0] = units.Foot.Of(20)
	b.Loads[0].Intensity, b.Loads[1].Intensity = units.KipPerFoot.Of(1.6), units.KipPerFoot.Of(2.1)
	b.Preferences.Bars = []string{"#7", "#8", "#9"}
	r := design(t, b)
	require.Equal(t, beam.Satisfied, r.Verdict, failures(r))
	relied := slices.ContainsFunc(r.Layout.Longitudinal, func(row beam.Row) bool { return row.Face == beam.Top && row.InCompression })
	require.True(t, relied, "%+v", r.Layout.Longitudinal)
	tied := slices.ContainsFunc(r.Checks, func(c beam.Check) bool { return strings.HasPrefix(c.ID, "ties.") && c.Outcome == beam.Pass })
	require.True(t, tied, "compression bars must be tied (ACI 318-19 9.7.6.4)")

	b.Loads[1].Intensity = units.KipPerFoot.Of(0.5)
	r = design(t, b)
	require.Equal(t, beam.Satisfied, r.Verdict, failures(r))
	for _, row := range r.Layout.Longitudinal {
		require.False(t, row.InCompression)
	}
}

func TestCuresPassWhenApplied(t *testing.T) {
	b := plain()
	b.Loads[1].Intensity = units.KipPerFoot.Of(9)
	r := design(t, b)
	require.Equal(t, beam.Unsatisfied, r.Verdict)
	require.NotEmpty(t, r.Binding)
	require.NotEmpty(t, failures(r), "the closest layout shows what fails")
	require.NotEmpty(t, r.Cures)
	for _, c := range r.Cures {
		again := b
		switch c.Change {
		case "depth":
			again.Section.Depth, _ = c.To.Length()
		case "width":
			again.Section.Width, _ = c.To.Length()
		case "concrete strength":
			again.Concrete.Strength, _ = c.To.Stress()
		case "stirrup legs":
			legs, _ := c.To.Plain()
			again.Preferences.MaxLegs = int(legs)
		default:
			t.Fatalf("unknown change %q", c.Change)
		}
		require.Equal(t, beam.Satisfied, design(t, again).Verdict, c.Change)
	}
}

func TestOutOfScopeBeforeAnyNumber(t *testing.T) {
	b := plain()
	b.Spans[0] = units.Foot.Of(7) // clear span 6 ft, less than four depths of 2 ft
	r := design(t, b)
	require.Equal(t, beam.OutOfScope, r.Verdict)
	require.Equal(t, "scope.deep-beam", r.Refusals[0].Rule)
	require.Empty(t, r.Checks)
	require.Empty(t, r.Layout.Longitudinal)
}

func TestSupportsOfEveryKind(t *testing.T) {
	support := func(k statics.SupportKind) beam.Support {
		if k == statics.Free {
			return beam.Support{Kind: k}
		}
		return beam.Support{Kind: k, Width: units.Inch.Of(12)}
	}
	tests := []struct {
		name        string
		left, right statics.SupportKind
		span        float64 // ft
		top         bool    // tension steel at the top is sized, not only nominal
	}{
		{"fixed both ends", statics.Fixed, statics.Fixed, 22, true},
		{"propped", statics.Fixed, statics.Roller, 22, true},
		{"propped, mirrored", statics.Pinned, statics.Fixed, 22, true},
		{"cantilever", statics.Fixed, statics.Free, 9, true},
		{"cantilever, mirrored", statics.Free, statics.Fixed, 9, true},
		{"rollers", statics.Roller, statics.Roller, 22, false},
	}
	for _, tt := range tests {
		t.Run(tt.name, func(t *testing.T) {
			b := plain()
			b.Supports = []beam.Support{support(tt.left), support(tt.right)}
			b.Spans[0] = units.Foot.Of(tt.span)
			r := design(t, b)
			require.Equal(t, beam.Satisfied, r.Verdict, failures(r))
			hogging := slices.ContainsFunc(r.Checks, func(c beam.Check) bool { return c.ID == "flexure.negative" && c.Outcome == beam.Pass })
			require.Equal(t, tt.top, hogging)
		})
	}
}

// A mirrored beam gets the mirrored design.
func TestMirroredBeam(t *testing.T) {
	b := plain()
	b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.PointLoad, At: units.Foot.Of(8), Force: units.Kip.Of(9)})
	left := design(t, b)
	b.Loads[2].At = units.Foot.Of(14)
	right := design(t, b)
	require.Equal(t, left.Verdict, right.Verdict)
	require.Equal(t, left.Layout.Longitudinal, right.Layout.Longitudinal)
	require.InEpsilon(t, left.Governing.Utilization, right.Governing.Utilization, 1e-9)
	require.InEpsilon(t, left.Quantities.SteelMass.In(units.Kilogram), right.Quantities.SteelMass.In(units.Kilogram), 0.02)
}

func TestDemandsInPlaceOfSpans(t *testing.T) {
	b := plain()
	b.Spans, b.Supports, b.Loads = nil, nil, nil
	b.Demands = []beam.Demand{
		{Name: "midspan", Moment: units.KipFoot.Of(190), Shear: units.Kip.Of(4)},
		{Name: "support", Moment: units.KipFoot.Of(-120), Shear: units.Kip.Of(42)},
	}
	r := design(t, b)
	require.Equal(t, beam.Satisfied, r.Verdict, failures(r))
	require.Len(t, r.Layout.Transverse, 1)
	require.Zero(t, r.Layout.Transverse[0].Count)
	i := slices.IndexFunc(r.Checks, func(c beam.Check) bool { return c.ID == "deflection.computed" })
	require.GreaterOrEqual(t, i, 0)
	require.Equal(t, beam.NotJudged, r.Checks[i].Outcome)
}

func TestPreferencesRank(t *testing.T) {
	mass := func(r *beam.Result) float64 { return r.Quantities.SteelMass.In(units.Kilogram) }
	count := func(r *beam.Result) (n int) {
		for _, row := range r.Layout.Longitudinal {
			n += row.Count
		}
		return n
	}
	with := func(p beam.Preference, edit func(*beam.Brief)) *beam.Result {
		b := plain()
		b.Preferences.Prefer = p
		if edit != nil {
			edit(&b)
		}
		r := design(t, b)
		require.Equal(t, beam.Satisfied, r.Verdict, failures(r))
		return r
	}
	least := with(beam.LeastSteel, nil)
	fewest := with(beam.FewestBars, nil)
	one := with(beam.OneSize, nil)
	require.LessOrEqual(t, mass(least), mass(fewest))
	require.LessOrEqual(t, mass(least), mass(one))
	require.Less(t, count(fewest), count(least))
	sizes := map[string]bool{}
	for _, row := range one.Layout.Longitudinal {
		sizes[row.Bar] = true
	}
	require.Len(t, sizes, 1)

	depths := func(b *beam.Brief) {
		b.Preferences.Depths = []units.Length{units.Inch.Of(18), units.Inch.Of(20), units.Inch.Of(28)}
	}
	shallow := with(beam.Shallowest, depths)
	require.True(t, shallow.Section.Depth.Less(least.Section.Depth))
	deep := with(beam.LeastSteel, depths)
	require.LessOrEqual(t, mass(deep), mass(least)*1.0000001)

	mixed := with(beam.LeastSteel, func(b *beam.Brief) { b.Preferences.Mixed = true })
	require.LessOrEqual(t, mass(mixed), mass(least))
}

// The self-weight that a design was analysed with is that of the depth it
// ended with, and the register says what became of the first assumption.
func TestSelfWeightFollowsTheDepth(t *testing.T) {
	b := plain()
	b.Preferences.Prefer = beam.Shallowest
	b.Preferences.Depths = []units.Length{units.Inch.Of(20)}
	r := design(t, b)
	require.Equal(t, units.Inch.Of(20), r.Section.Depth)
	// 150 lb/ft3 x 14 in x 20 in = 291.67 lb/ft (own calculation)
	require.InEpsilon(t, 0.29166667, r.Problem.SelfWeight.In(units.KipPerFoot), 1e-7)
	i := slices.IndexFunc(r.Assumptions, func(a beam.Assumption) bool { return a.ID == "self-weight.section" })
	require.GreaterOrEqual(t, i, 0)
	require.False(t, r.Assumptions[i].Holds, "the section first tried was 24 in deep")
	require.Contains(t, r.Assumptions[i].Found, "analysed again")
}

func TestSameInputSameBytes(t *testing.T) {
	b := plain()
	first, err := json.Marshal(design(t, b).Checks)
	require.NoError(t, err)
	for range 3 {
		again, err := json.Marshal(design(t, b).Checks)
		require.NoError(t, err)
		require.Equal(t, string(first), string(again))
	}
	require.Equal(t, plain(), b, "the brief is not changed")
}

func TestCheckLayoutAgreesWithDesign(t *testing.T) {
	r := design(t, plain())
	again, err := beam.CheckLayout(context.Background(), aci318.ACI31819(), plain(), r.Layout)
	require.NoError(t, err)
	require.Equal(t, r.Verdict, again.Verdict)
	require.Equal(t, r.Checks, again.Checks)
}

func TestCancelledContext(t *testing.T) {
	ctx, cancel := context.WithCancel(context.Background())
	cancel()
	_, err := beam.Design(ctx, aci318.ACI31819(), plain())
	require.ErrorIs(t, err, context.Canceled)
	_, err = beam.CheckLayout(ctx, aci318.ACI31819(), plain(), beam.Layout{})
	require.ErrorIs(t, err, context.Canceled)
}

func TestFaultsOfALayout(t *testing.T) {
	sound := design(t, plain()).Layout
	tests := []struct {
		name string
		edit func(l *beam.Layout)
		path string
	}{
		{"unknown bar", func(l *beam.Layout) { l.Longitudinal[0].Bar = "#12" }, "/layout/longitudinal/0/bar"},
		{"no bars in a row", func(l *beam.Layout) { l.Longitudinal[0].Count = 0 }, "/layout/longitudinal/0/count"},
		{"a million bars", func(l *beam.Layout) { l.Longitudinal[0].Count = 1e6 }, "/layout/longitudinal/0/count"},
		{"no face", func(l *beam.Layout) { l.Longitudinal[0].Face = 0 }, "/layout/longitudinal/0/face"},
		{"layer zero", func(l *beam.Layout) { l.Longitudinal[0].Layer = 0 }, "/layout/longitudinal/0/layer"},
		{"layer two of none", func(l *beam.Layout) { l.Longitudinal[0].Layer = 2 }, "/layout/longitudinal"},
		{"cut off", func(l *beam.Layout) { l.Longitudinal[0].From = units.Foot.Of(3) }, "/layout/longitudinal/0/to"},
		{"hooked", func(l *beam.Layout) { l.Longitudinal[0].End = "hook" }, "/layout/longitudinal/0"},
		{"side bars without spacing", func(l *beam.Layout) {
			l.Longitudinal = append(l.Longitudinal, beam.Row{Bar: "#4", Count: 2, Face: beam.Side})
		}, "/layout/longitudinal/2/spacing"},
		{"two rows of side bars", func(l *beam.Layout) {
			side := beam.Row{Bar: "#4", Count: 2, Face: beam.Side, Spacing: units.Inch.Of(5)}
			l.Longitudinal = append(l.Longitudinal, side, side)
		}, "/layout/longitudinal/3"},
		{"one leg", func(l *beam.Layout) { l.Transverse[0].Legs = 1 }, "/layout/transverse/0/legs"},
		{"no spacing", func(l *beam.Layout) { l.Transverse[0].Spacing = units.Length{} }, "/layout/transverse/0/spacing"},
		{"off the span", func(l *beam.Layout) { l.Transverse[0].To = units.Foot.Of(40) }, "/layout/transverse/0/to"},
		{"too few stirrups", func(l *beam.Layout) { l.Transverse[0].Count = 1 }, "/layout/transverse/0/count"},
		{"overlap", func(l *beam.Layout) { l.Transverse = append(l.Transverse, l.Transverse[0]) }, "/layout/transverse/1"},
		{"second span", func(l *beam.Layout) { l.Transverse[0].Span = 2 }, "/layout/transverse/0/span"},
		{"spiral", func(l *beam.Layout) { l.Transverse[0].Form = "spiral" }, "/layout/transverse/0/form"},
	}
	for _, tt := range tests {
		t.Run(tt.name, func(t *testing.T) {
			l := beam.Layout{Longitudinal: slices.Clone(sound.Longitudinal), Transverse: slices.Clone(sound.Transverse)}
			tt.edit(&l)
			_, err := beam.CheckLayout(context.Background(), aci318.ACI31819(), plain(), l)
			var input *beam.InputError
			require.ErrorAs(t, err, &input)
			require.Equal(t, tt.path, input.Faults[0].Path, "%v", err)
		})
	}
}

// An empty layout, and one whose stirrups stop short, are judged, not
// refused, and never pass.
func TestWorseLayoutsFail(t *testing.T) {
	sound := design(t, plain()).Layout
	check := func(l beam.Layout) *beam.Result {
		r, err := beam.CheckLayout(context.Background(), aci318.ACI31819(), plain(), l)
		require.NoError(t, err)
		return r
	}
	require.Equal(t, beam.Unsatisfied, check(beam.Layout{}).Verdict)
	require.Equal(t, beam.Unsatisfied, check(beam.Layout{Longitudinal: sound.Longitudinal}).Verdict, "no stirrups")
	gap := beam.Layout{Longitudinal: sound.Longitudinal, Transverse: slices.Clone(sound.Transverse)}
	gap.Transverse[0].From = gap.Transverse[0].From.Add(units.Foot.Of(3))
	gap.Transverse[0].Count = 0
	require.Equal(t, beam.Unsatisfied, check(gap).Verdict, "a gap at the support")
	fewer := beam.Layout{Longitudinal: slices.Clone(sound.Longitudinal), Transverse: sound.Transverse}
	fewer.Longitudinal[0].Count -= 2
	require.Equal(t, beam.Unsatisfied, check(fewer).Verdict, "two bars fewer")
}

// A cover given in the brief is the one that bars are laid with.
func TestCoverOfTheBrief(t *testing.T) {
	b := plain()
	b.Cover = units.Inch.Of(2.5)
	r := design(t, b)
	require.Equal(t, units.Inch.Of(2.5), r.Cover)
	for _, bar := range r.Bars {
		if bar.Face == beam.Bottom && bar.Layer == 1 {
			require.True(t, units.Inch.Of(2.5).Less(bar.Y.Sub(bar.Diameter.Scale(0.5))))
		}
	}
}

// Side-face bars come with depth, for beams that sag and for those that hog
// (ACI 318-19 9.7.2.3).
func TestSideBarsOfADeepBeam(t *testing.T) {
	for _, kind := range []statics.SupportKind{statics.Pinned, statics.Fixed} {
		b := plain()
		b.Section.Depth, b.Spans[0] = units.Inch.Of(44), units.Foot.Of(34)
		b.Supports[0].Kind = kind
		if kind == statics.Fixed {
			b.Supports[1].Kind = kind
		}
		r := design(t, b)
		require.Equal(t, beam.Satisfied, r.Verdict, failures(r))
		i := slices.IndexFunc(r.Layout.Longitudinal, func(row beam.Row) bool { return row.Face == beam.Side })
		require.GreaterOrEqual(t, i, 0)
		n := 0
		for _, bar := range r.Bars {
			if bar.Face == beam.Side {
				n++
			}
		}
		require.Equal(t, 2*r.Layout.Longitudinal[i].Count, n)
	}
}

// A depth at which only the member as a whole fails does not win by its
// weight.
func TestDepthsAreRankedAsWholeMembers(t *testing.T) {
	b := plain()
	b.Preferences.Prefer = beam.Shallowest
	b.Preferences.Depths = []units.Length{units.Inch.Of(14), units.Inch.Of(16), units.Inch.Of(18), units.Inch.Of(20)}
	b.Loads[0].Intensity, b.Loads[1].Intensity = units.KipPerFoot.Of(0.1), units.KipPerFoot.Of(0.1)
	r := design(t, b)
	require.Equal(t, beam.Satisfied, r.Verdict, failures(r))
	// Table 9.3.1.1: l/16 = 264/16 = 16.5 in for a simple span
	require.Equal(t, units.Inch.Of(18), r.Section.Depth)
}

// The strengths of the final bars come with the second route's answer.
func TestResultHoldsStrengths(t *testing.T) {
	r := design(t, plain())
	require.Len(t, r.Flexure, 1)
	require.Equal(t, beam.Positive, r.Flexure[0].Sense)
	require.Less(t, r.Flexure[0].CrossCheck.Difference, 1e-6)
	i := slices.IndexFunc(r.Checks, func(c beam.Check) bool { return c.ID == "flexure.positive" })
	require.InEpsilon(t, r.Checks[i].Capacity.SI(), r.Flexure[0].Design.Amount().SI(), 1e-12)
}

// What no code is needed to see: bars and stirrups that would run through each
// other or out of the beam.
func TestGeometryOfALayout(t *testing.T) {
	sound := design(t, plain()).Layout
	tests := []struct {
		name string
		edit func(l *beam.Layout)
		id   string
	}{
		{"side bars beyond the beam", func(l *beam.Layout) {
			l.Longitudinal = append(l.Longitudinal, beam.Row{Bar: "#4", Count: 30, Face: beam.Side, Spacing: units.Inch.Of(9)})
		}, "side-face.room"},
		{"side bars on top of each other", func(l *beam.Layout) {
			l.Longitudinal = append(l.Longitudinal, beam.Row{Bar: "#4", Count: 2, Face: beam.Side, Spacing: units.Inch.Of(0.9)})
		}, "side-face.clear"},
		{"stirrups through each other", func(l *beam.Layout) {
			l.Transverse[0].Spacing, l.Transverse[0].Count = units.Inch.Of(0.4), 0
		}, "stirrup.clear"},
		{"more bars than the width holds", func(l *beam.Layout) { l.Longitudinal[0].Count = 12 }, "fit.width"},
		{"layers up to the top", func(l *beam.Layout) {
			for layer := 2; layer <= beam.MaxLayers; layer++ {
				l.Longitudinal = append(l.Longitudinal, beam.Row{Bar: "#18", Count: 2, Face: beam.Bottom, Layer: layer})
			}
			l.Longitudinal[0].Bar, l.Longitudinal[0].Count = "#18", 2
			for layer := 2; layer <= beam.MaxLayers; layer++ {
				l.Longitudinal = append(l.Longitudinal, beam.Row{Bar: "#18", Count: 2, Face: beam.Top, Layer: layer})
			}
			l.Longitudinal[1].Bar = "#18"
		}, "fit.depth"},
	}
	for _, tt := range tests {
		t.Run(tt.name, func(t *testing.T) {
			l := beam.Layout{Longitudinal: slices.Clone(sound.Longitudinal), Transverse: slices.Clone(sound.Transverse)}
			tt.edit(&l)
			r, err := beam.CheckLayout(context.Background(), aci318.ACI31819(), plain(), l)
			require.NoError(t, err)
			require.Equal(t, beam.Unsatisfied, r.Verdict)
			require.Contains(t, r.Binding, tt.id)
		})
	}
}

// Open stirrups are scheduled as what they are: a leg shorter.
func TestOpenStirrupsInTheSchedule(t *testing.T) {
	closed := design(t, plain())
	l := beam.Layout{Longitudinal: closed.Layout.Longitudinal, Transverse: slices.Clone(closed.Layout.Transverse)}
	for i := range l.Transverse {
		l.Transverse[i].Form = "open"
	}
	open, err := beam.CheckLayout(context.Background(), aci318.ACI31819(), plain(), l)
	require.NoError(t, err)
	a, b := closed.Schedule[len(closed.Schedule)-1], open.Schedule[len(open.Schedule)-1]
	require.Contains(t, a.Shape, "closed")
	require.Contains(t, b.Shape, "open")
	require.True(t, b.Length.Less(a.Length))
	require.True(t, b.Mass.LessThan(a.Mass))
}
