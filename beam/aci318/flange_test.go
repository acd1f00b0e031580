package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// teeBrief is an interior beam of a floor: 12 in. web, 5 in. slab, 24 in. deep,
// simply supported over 25 ft between centres of supports 12 in. wide.
func teeBrief() beam.Brief {
	b := usBrief()
	b.Section = beam.Section{
		Shape: beam.Tee, Width: in(12), Depth: in(24), FlangeThickness: in(5),
		Slab: beam.Slab{ClearLeft: units.Foot.Of(8), ClearRight: units.Foot.Of(8)},
	}
	b.Spans = []units.Length{units.Foot.Of(25)}
	return b
}

// resolved puts a brief to an edition.
func resolved(t testing.TB, c Code, b beam.Brief) (beam.Brief, map[string]beam.Assumption) {
	t.Helper()
	var note beam.Register
	require.Empty(t, c.Resolve(&b, &note))
	said := map[string]beam.Assumption{}
	for _, a := range note.All() {
		said[a.ID] = a
	}
	return b, said
}

// Table 6.3.2.1, each limit governing in turn. Own calculation from the table:
// clear span 25 - 1 = 24 ft = 288 in.
func TestEffectiveFlange(t *testing.T) {
	for _, tc := range []struct {
		name        string
		shape       beam.Shape
		left, right float64 // clear to the next webs, ft
		thickness   float64 // in
		wantLeft    float64 // in
		wantRight   float64
		said        string
	}{
		{"interior: 8h", beam.Tee, 8, 8, 4, 32, 32, "32 in on the left (8h) and 32 in on the right (8h)"},
		{"interior: ln/8", beam.Tee, 8, 8, 5, 36, 36, "36 in on the left (ℓn/8)"},
		{"interior: sw/2 on one side", beam.Tee, 5, 8, 5, 30, 36, "30 in on the left (half the clear distance to the next web, sw/2) and 36 in on the right (ℓn/8)"},
		{"edge: 6h", beam.Ell, 0, 8, 3.5, 0, 21, "over 21 in on the right (6h)"},
		{"edge: ln/12", beam.Ell, 0, 8, 5, 0, 24, "over 24 in on the right (ℓn/12)"},
		{"edge on the left: sw/2", beam.Ell, 3, 0, 5, 18, 0, "over 18 in on the left (half the clear distance"},
	} {
		t.Run(tc.name, func(t *testing.T) {
			for _, c := range Editions() {
				b := teeBrief()
				b.Section.Shape, b.Section.FlangeThickness = tc.shape, in(tc.thickness)
				b.Section.Slab = beam.Slab{ClearLeft: units.Foot.Of(tc.left), ClearRight: units.Foot.Of(tc.right)}
				b, said := resolved(t, c, b)
				s := &b.Section
				require.InDelta(t, tc.wantLeft, s.OverhangLeft.In(units.Inch), 1e-9)
				require.InDelta(t, tc.wantRight, s.OverhangRight.In(units.Inch), 1e-9)
				require.InDelta(t, 12+tc.wantLeft+tc.wantRight, s.FlangeWidth.In(units.Inch), 1e-9)
				a := said["flange.width"]
				require.True(t, a.Holds)
				if c.e.system == units.US {
					require.Contains(t, a.Assumed, tc.said)
					require.Contains(t, a.Found, "288 in")
				}
			}
		})
	}
}

// The flange of several spans goes by the shortest clear span: 16 ft between
// centres, 15 ft clear, ℓn/8 = 22.5 in.
func TestEffectiveFlangeOfSeveralSpans(t *testing.T) {
	b := teeBrief()
	b.Spans = append(b.Spans, units.Foot.Of(16))
	b.Supports = append(b.Supports, beam.Support{Kind: statics.Roller, Width: in(12)})
	b, _ = resolved(t, ACI31819(), b)
	require.InDelta(t, 22.5, b.Section.OverhangLeft.In(units.Inch), 1e-9)
}

// Spans that make no sense are faults of the brief; the flange asks nothing of
// them.
func TestEffectiveFlangeWithoutSoundSpans(t *testing.T) {
	for name, edit := range map[string]func(*beam.Brief){
		"no spans":         func(b *beam.Brief) { b.Spans = nil },
		"supports missing": func(b *beam.Brief) { b.Supports = b.Supports[:1] },
		"no clear span":    func(b *beam.Brief) { b.Supports[0].Width = units.Foot.Of(60) },
		"no flange":        func(b *beam.Brief) { b.Section.FlangeThickness = units.Length{} },
	} {
		t.Run(name, func(t *testing.T) {
			b := teeBrief()
			edit(&b)
			b, said := resolved(t, ACI31819(), b)
			require.True(t, b.Section.FlangeWidth.IsZero())
			require.NotContains(t, said, "flange.width")
		})
	}
}

// A flange width that is given stays the engineer's to confirm.
func TestGivenFlangeWidthIsOpen(t *testing.T) {
	for _, tc := range []struct {
		shape    beam.Shape
		isolated bool
		said     string
	}{
		{beam.Tee, false, "no more than the effective width of 6.3.2.1"},
		{beam.Ell, false, "no more than the effective width of 6.3.2.1"},
		{beam.Tee, true, "6.3.2.2"},
		{beam.InvertedTee, false, "the ledges run along the whole span"},
	} {
		b := teeBrief()
		b.Section.Shape, b.Section.Slab, b.Section.FlangeWidth, b.Section.Isolated = tc.shape, beam.Slab{}, in(40), tc.isolated
		b, said := resolved(t, ACI31819(), b)
		require.True(t, said["flange.width"].Open)
		require.Contains(t, said["flange.width"].Assumed, tc.said)
		require.InDelta(t, 40, b.Section.FlangeWidth.In(units.Inch), 0)
	}
	_, said := resolved(t, ACI31819(), usBrief())
	require.NotContains(t, said, "flange.width")
	require.NotContains(t, said, "flexure.determinate")
}

// 9.6.1.2 tells determinate beams from others by their reactions.
func TestDeterminate(t *testing.T) {
	kinds := func(k ...statics.SupportKind) *beam.Brief {
		b := &beam.Brief{Spans: make([]units.Length, len(k)-1)}
		for _, kind := range k {
			b.Supports = append(b.Supports, beam.Support{Kind: kind})
		}
		return b
	}
	fixed, free, pinned, roller := statics.Fixed, statics.Free, statics.Pinned, statics.Roller
	require.True(t, determinate(kinds(pinned, roller)))
	require.True(t, determinate(kinds(fixed, free)))
	require.True(t, determinate(kinds(free, pinned, roller, free)), "overhangs at both ends")
	require.False(t, determinate(kinds(fixed, roller)))
	require.False(t, determinate(kinds(fixed, fixed)))
	require.False(t, determinate(kinds(pinned, roller, roller)))
	require.True(t, determinate(&beam.Brief{}), "demands do not tell: the stricter")
}

// What Resolve says of it.
func TestDeterminacyIsSaid(t *testing.T) {
	b := teeBrief()
	_, said := resolved(t, ACI31819(), b)
	require.Contains(t, said["flexure.determinate"].Assumed, "is statically determinate")
	require.True(t, said["flexure.determinate"].Holds)
	b.Supports[0].Kind = statics.Fixed
	_, said = resolved(t, ACI31819(), b)
	require.Contains(t, said["flexure.determinate"].Assumed, "indeterminate")
	b.Spans, b.Supports, b.Section.Slab, b.Section.FlangeWidth = nil, nil, beam.Slab{}, in(40)
	_, said = resolved(t, ACI31819(), b)
	require.True(t, said["flexure.determinate"].Open)
}

// 6.3.2.2, both limits from both sides: bw = 12 in asks for a flange of 6 in
// and at most 48 in.
func TestIsolatedTee(t *testing.T) {
	for _, tc := range []struct {
		name             string
		thickness, width float64
		want             beam.Outcome
		clause           string
		utilization      float64
	}{
		{"both just met", 6, 48, beam.Pass, "6.3.2.2(a)", 1},
		{"too thin", 5.9, 40, beam.Fail, "6.3.2.2(a)", 6 / 5.9},
		{"too wide", 7, 49, beam.Fail, "6.3.2.2(b)", 49.0 / 48},
		{"width governs", 8, 45, beam.Pass, "6.3.2.2(b)", 45.0 / 48},
	} {
		t.Run(tc.name, func(t *testing.T) {
			for _, c := range Editions() {
				b := demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
				b.Section = beam.Section{Shape: beam.Tee, Width: in(12), Depth: in(24), FlangeThickness: in(tc.thickness), FlangeWidth: in(tc.width), Isolated: true}
				r, _ := check(t, c, b, []beam.Row{bottom(3, "#8"), top(2, "#4")})
				got := find1(t, r, "flange.isolated")
				require.Equal(t, tc.want, got.Outcome)
				require.Equal(t, tc.clause, got.Clause)
				require.InEpsilon(t, tc.utilization, got.Utilization, 1e-9)
			}
		})
	}
}

// 9.2.3.1 goes by the face in compression: of a tee 60 in. wide in sagging 50 ×
// 60 = 3000 in, in hogging 50 × 12 = 600 in, and in both the lesser.
func TestBracingGoesByTheCompressionFace(t *testing.T) {
	up, down := beam.Demand{Name: "up", Moment: units.KipFoot.Of(100)}, beam.Demand{Name: "down", Moment: units.KipFoot.Of(-60)}
	for _, tc := range []struct {
		demands []beam.Demand
		want    float64
	}{
		{[]beam.Demand{up}, 3000}, {[]beam.Demand{down}, 600}, {[]beam.Demand{up, down}, 600},
		{[]beam.Demand{{Name: "shear", Shear: units.Kip.Of(5)}}, 600},
	} {
		b := demandBrief(tc.demands...)
		b.Section = beam.Section{Shape: beam.Tee, Width: in(12), Depth: in(24), FlangeThickness: in(5), FlangeWidth: in(60)}
		b.Braced = in(600)
		r, _ := check(t, ACI31819(), b, []beam.Row{bottom(3, "#8"), top(3, "#8")})
		c := find1(t, r, "bracing.spacing")
		require.InDelta(t, tc.want, valueIn(t, c.Capacity, "in"), 1e-9)
		require.Equal(t, beam.Pass, c.Outcome)
	}
}

// What belongs to flanges and is not judged is named.
func TestFlangesNameWhatIsNotJudged(t *testing.T) {
	b := demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	b.Section = beam.Section{Shape: beam.Tee, Width: in(12), Depth: in(24), FlangeThickness: in(5), FlangeWidth: in(60)}
	r, _ := check(t, ACI31819(), b, []beam.Row{bottom(3, "#8"), top(2, "#4")})
	require.Equal(t, beam.NotJudged, find1(t, r, "flange.transverse").Outcome)
	require.Empty(t, checksOf(r.Checks, "ledge.design"))
	b.Section.Shape = beam.InvertedTee
	r, _ = check(t, ACI31819(), b, []beam.Row{bottom(3, "#8"), top(2, "#4")})
	require.Equal(t, beam.NotJudged, find1(t, r, "ledge.design").Outcome)
	require.Empty(t, checksOf(r.Checks, "flange.transverse"))
}

// An outline does not tell a slab from a web: that all of it works is open, and
// what is asked of flanges is named where it is wider than the strip of its
// stirrups.
func TestOutlineLeavesItsFlangeOpen(t *testing.T) {
	tee := polygonOf([2]float64{18, 0}, [2]float64{30, 0}, [2]float64{30, 20}, [2]float64{48, 20}, [2]float64{48, 24}, [2]float64{0, 24}, [2]float64{0, 20}, [2]float64{18, 20})
	box := polygonOf([2]float64{0, 0}, [2]float64{24, 0}, [2]float64{24, 24}, [2]float64{0, 24})
	for _, tc := range []struct {
		section beam.Section
		wide    bool
	}{{tee, true}, {box, false}} {
		b := demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(-100)})
		b.Section = tc.section
		r, _ := check(t, ACI31819(), b, []beam.Row{bottom(2, "#8"), top(3, "#9")})
		a := assumption(t, r, "section.outline")
		require.True(t, a.Open)
		require.Contains(t, a.Assumed, "6.3.2")
		require.Contains(t, a.UsedIn, "flexure.negative")
		found := checksOf(r.Checks, "flange.transverse")
		q := teeQuery()
		q.Section = tc.section
		s, err := ACI31819().Strengths(q)
		require.NoError(t, err)
		if !tc.wide {
			require.Empty(t, found)
			require.Empty(t, s.Notes)
			continue
		}
		require.Len(t, found, 1)
		require.Equal(t, beam.NotJudged, found[0].Outcome)
		require.Contains(t, found[0].Clause, "7.5.2.3")
		require.Contains(t, found[0].Clause, "24.3.4")
		require.Contains(t, s.Notes[0], "6.3.2")
	}
	for _, a := range func() []beam.Assumption {
		r, _ := check(t, ACI31819(), usBrief(), []beam.Row{bottom(4, "#9"), top(2, "#5")})
		return r.Assumptions
	}() {
		require.NotEqual(t, "section.outline", a.ID)
	}
}
