package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// teeQuery is a tee of 12 in. web, 24 in. deep, with a flange of 48 by 4 in.
func teeQuery() beam.SectionQuery {
	return beam.SectionQuery{
		Section:  beam.Section{Shape: beam.Tee, Width: in(12), Depth: in(24), FlangeThickness: in(4), FlangeWidth: in(48)},
		Concrete: beam.Concrete{Strength: psi(4000), Kind: beam.Normalweight},
		Bending:  beam.Positive,
		Layers:   []beam.SteelLayer{{Area: in2(4), Depth: in(21), Yield: psi(60000)}, {Area: in2(2), Depth: in(3), Yield: psi(60000)}},
	}
}

// polygonOf gives a section as the outline it has, in inches, from the left
// bottom corner on.
func polygonOf(points ...[2]float64) beam.Section {
	s := beam.Section{Shape: beam.Polygon}
	for _, p := range points {
		s.Outline = append(s.Outline, beam.Point{X: in(p[0]), Y: in(p[1])})
	}
	return s
}

func flexureOf(t testing.TB, c Code, q beam.SectionQuery) beam.FlexureStrength {
	t.Helper()
	s, err := c.Strengths(q)
	require.NoError(t, err)
	require.Empty(t, s.Refusals)
	return s.Flexure
}

func requireSameFlexure(t testing.TB, a, b beam.FlexureStrength) {
	t.Helper()
	require.InEpsilon(t, a.Nominal.In(units.KipFoot), b.Nominal.In(units.KipFoot), 1e-9)
	require.InEpsilon(t, a.Design.In(units.KipFoot), b.Design.In(units.KipFoot), 1e-9)
	require.InEpsilon(t, a.NeutralAxis.In(units.Inch), b.NeutralAxis.In(units.Inch), 1e-9)
	require.InEpsilon(t, a.ExtremeStrain, b.ExtremeStrain, 1e-9)
	require.InEpsilon(t, a.EffectiveDepth.In(units.Inch), b.EffectiveDepth.In(units.Inch), 1e-9)
}

// A flange as wide as the web, or as deep as the section, makes a rectangle, in
// every edition and either sense; and a layer of no area is no layer.
func TestTeeBecomesARectangle(t *testing.T) {
	for _, c := range Editions() {
		for _, sense := range []beam.Sense{beam.Positive, beam.Negative} {
			plain := teeQuery()
			plain.Bending = sense
			plain.Section = rectangle(in(12), in(24))
			want := flexureOf(t, c, plain)
			narrow := teeQuery()
			narrow.Bending, narrow.Section.FlangeWidth = sense, in(12)
			requireSameFlexure(t, want, flexureOf(t, c, narrow))
			narrow.Section.FlangeWidth = in(12 * (1 + 1e-11))
			requireSameFlexure(t, want, flexureOf(t, c, narrow))

			plain.Section = rectangle(in(48), in(24))
			deep := teeQuery()
			deep.Bending, deep.Section.FlangeThickness = sense, in(23.99)
			want = flexureOf(t, c, plain)
			if sense == beam.Positive { // in hogging the sliver at the face is the web's
				requireSameFlexure(t, want, flexureOf(t, c, deep))
			}

			full := teeQuery()
			full.Bending = sense
			want = flexureOf(t, c, full)
			full.Layers = append(full.Layers, beam.SteelLayer{Area: units.SquareMillimetre.Of(1), Depth: in(12), Yield: psi(60000)})
			require.InEpsilon(t, want.Nominal.In(units.KipFoot), flexureOf(t, c, full).Nominal.In(units.KipFoot), 1e-3)
		}
	}
}

// A section turned upside down, under the opposite moment, is the same.
func TestMirroredShapes(t *testing.T) {
	up := teeQuery()
	down := teeQuery()
	down.Section.Shape, down.Bending = beam.InvertedTee, beam.Negative
	down.Layers = []beam.SteelLayer{{Area: in2(4), Depth: in(3), Yield: psi(60000)}, {Area: in2(2), Depth: in(21), Yield: psi(60000)}}
	for _, c := range Editions() {
		a, b := flexureOf(t, c, up), flexureOf(t, c, down)
		requireSameFlexure(t, a, b)
		require.InEpsilon(t, a.MinimumSteel.In(units.SquareInch), b.MinimumSteel.In(units.SquareInch), 1e-12)
	}
}

// A tee given as its outline is the tee; an ell bends as the tee of the same
// flange.
func TestOutlineOfATee(t *testing.T) {
	outline := teeQuery()
	outline.Section = polygonOf([2]float64{18, 0}, [2]float64{30, 0}, [2]float64{30, 20}, [2]float64{48, 20}, [2]float64{48, 24}, [2]float64{0, 24}, [2]float64{0, 20}, [2]float64{18, 20})
	ell := teeQuery()
	ell.Section.Shape = beam.Ell
	for _, sense := range []beam.Sense{beam.Positive, beam.Negative} {
		tee := teeQuery()
		tee.Bending, outline.Bending, ell.Bending = sense, sense, sense
		want := flexureOf(t, ACI31819(), tee)
		requireSameFlexure(t, want, flexureOf(t, ACI31819(), outline))
		requireSameFlexure(t, want, flexureOf(t, ACI31819(), ell))
		require.InEpsilon(t, want.MinimumSteel.In(units.SquareInch), flexureOf(t, ACI31819(), outline).MinimumSteel.In(units.SquareInch), 1e-9)
	}
}

// A box of 24 by 24 in. with walls of 4 in: in sagging the block of 3 in2 lies in
// the top wall, a = 180/(0.85 × 4 × 24) = 2.206 in, Mn = 180 (21 - a/2). With 8.16
// in2, Mn = 489.6 kip of block: 4 in. of wall give 326.4, two webs of 4 in. the
// other 163.2: a = 4 + 163.2/(3.4 × 8) = 10 in; Mn = 489.6 × 21 - 326.4 × 2 -
// 163.2 × 7. Own calculation.
func TestBox(t *testing.T) {
	q := teeQuery()
	q.Section = polygonOf([2]float64{0, 0}, [2]float64{24, 0}, [2]float64{24, 24}, [2]float64{0, 24})
	q.Section.Voids = [][]beam.Point{{{X: in(4), Y: in(4)}, {X: in(20), Y: in(4)}, {X: in(20), Y: in(20)}, {X: in(4), Y: in(20)}}}
	q.Layers = []beam.SteelLayer{{Area: in2(3), Depth: in(21), Yield: psi(60000)}}
	f := flexureOf(t, ACI31814(), q)
	a := 180 / (3.4 * 24)
	require.InEpsilon(t, a, f.BlockDepth.In(units.Inch), 1e-9)
	require.InEpsilon(t, 180*(21-a/2), f.Nominal.In(units.KipInch), 1e-9)
	// Least steel goes by the whole width: 200/60000 × 24 × 21.
	require.InEpsilon(t, 200.0/60000*24*21, f.MinimumSteel.In(units.SquareInch), 1e-9)
	q.Layers[0].Area = in2(8.16)
	f = flexureOf(t, ACI31814(), q)
	if f.Layers[0].Stress == psi(60000) {
		require.InEpsilon(t, 10, f.BlockDepth.In(units.Inch), 1e-9)
		require.InEpsilon(t, 489.6*21-326.4*2-163.2*7, f.Nominal.In(units.KipInch), 1e-9)
	} else {
		require.Fail(t, "the layer was to yield")
	}
}

// What a query of a flanged section is told.
func TestNotesOfAFlangedSection(t *testing.T) {
	q := teeQuery()
	s, err := ACI31819().Strengths(q)
	require.NoError(t, err)
	require.Contains(t, s.Notes, "the flange width is taken as given: 6.3.2.1 limits what works with the web")
	require.InEpsilon(t, 200.0/60000*12*21, s.Flexure.MinimumSteel.In(units.SquareInch), 1e-9)
	q.Bending = beam.Negative
	s, err = ACI31819().Strengths(q)
	require.NoError(t, err)
	require.Contains(t, s.Notes, "the flange is in tension: 24.3.4 spreads a part of the steel over it")
	require.InEpsilon(t, 200.0/60000*24*21, s.Flexure.MinimumSteel.In(units.SquareInch), 1e-9, "2bw")
	require.Empty(t, s.Checks)
	q.Section.Isolated = true
	s, err = ACI31819().Strengths(q)
	require.NoError(t, err)
	require.Equal(t, beam.Fail, checkOf(t, s.Checks, "flange.isolated").Outcome)
	require.Contains(t, s.Notes, "the flange does not meet 6.3.2.2, by which an isolated tee may count it")
	q.Section.FlangeThickness = in(6)
	s, err = ACI31819().Strengths(q)
	require.NoError(t, err)
	require.Equal(t, beam.Pass, checkOf(t, s.Checks, "flange.isolated").Outcome)
	require.NotContains(t, s.Notes, "the flange does not meet 6.3.2.2, by which an isolated tee may count it")
}

// Faults of a shape are those that a brief would have.
func TestFaultsOfAQueriedShape(t *testing.T) {
	for name, tc := range map[string]struct {
		path string
		edit func(*beam.SectionQuery)
	}{
		"no flange": {"/section/flange_width", func(q *beam.SectionQuery) { q.Section.FlangeWidth = units.Length{} }},
		"slab": {"/section/slab", func(q *beam.SectionQuery) {
			q.Section.FlangeWidth, q.Section.Slab = units.Length{}, beam.Slab{ClearLeft: in(60), ClearRight: in(60)}
		}},
		"thin": {"/section/flange_thickness", func(q *beam.SectionQuery) { q.Section.FlangeThickness = units.Length{} }},
		"crossed lines": {"/section/outline", func(q *beam.SectionQuery) {
			q.Section = polygonOf([2]float64{0, 0}, [2]float64{10, 10}, [2]float64{10, 0}, [2]float64{0, 10})
		}},
		"layer outside": {"/layers/0/depth", func(q *beam.SectionQuery) { q.Layers[0].Depth = in(25) }},
	} {
		t.Run(name, func(t *testing.T) {
			q := teeQuery()
			tc.edit(&q)
			_, err := ACI31819().Strengths(q)
			var input *beam.InputError
			require.ErrorAs(t, err, &input)
			require.Equal(t, tc.path, input.Faults[0].Path)
		})
	}
}

// Required steel of a tee put back, in both senses, singly and doubly, through the
// public door, in four editions.
func TestRequiredSteelOfShapes(t *testing.T) {
	single, double := 0, 0
	for _, c := range Editions() {
		for _, shape := range []beam.Section{
			teeQuery().Section,
			{Shape: beam.InvertedTee, Width: in(12), Depth: in(24), FlangeThickness: in(5), FlangeWidth: in(30)},
			polygonOf([2]float64{4, 0}, [2]float64{16, 0}, [2]float64{20, 24}, [2]float64{0, 24}),
		} {
			for _, sense := range []beam.Sense{beam.Positive, beam.Negative} {
				for moment := 20.0; moment <= 900; moment += 40 {
					q := SteelQuery{Section: shape, Bending: sense, Depth: in(21), Top: in(2.5), Strength: psi(4000), Yield: psi(60000), Moment: units.KipFoot.Of(moment)}
					r, err := c.RequiredSteel(q)
					require.NoError(t, err, "%v, %v, %v kip-ft", shape.Shape, sense, moment)
					if r.Compression.IsZero() {
						single++
					} else {
						double++
					}
					require.Equal(t, 1, r.Equilibria)
				}
			}
		}
	}
	require.Greater(t, single, 100)
	require.Greater(t, double, 50)
}

// Each bar yields, and is classed, by its own strength. Own calculation: 2 in2 of
// Grade 60 at 19 in. and 1 in2 of Grade 80 at 21 in, 12 in. wide: a = (120 +
// 80)/40.8 = 4.902 in, c = 5.767 in; the extreme layer strains 0.0079 against
// 80/29000 + 0.003.
func TestGradesByRow(t *testing.T) {
	q := teeQuery()
	q.Section = rectangle(in(12), in(24))
	q.Layers = []beam.SteelLayer{{Area: in2(2), Depth: in(19), Yield: psi(60000)}, {Area: in2(1), Depth: in(21), Yield: psi(80000)}}
	f := flexureOf(t, ACI31819(), q)
	a := 200 / 40.8
	require.InEpsilon(t, a, f.BlockDepth.In(units.Inch), 1e-9)
	require.InEpsilon(t, 120*19+80*21-200*a/2, f.Nominal.In(units.KipInch), 1e-9)
	require.InEpsilon(t, 80.0/29000, f.YieldStrain, 1e-12)
	require.InEpsilon(t, 80.0/29000+0.003, f.LeastStrain, 1e-12)
	require.InEpsilon(t, 60000, f.Layers[0].Stress.In(units.PSI), 1e-12)
	// Least steel goes by the weaker.
	require.InEpsilon(t, 200.0/60000*12*f.EffectiveDepth.In(units.Inch), f.MinimumSteel.In(units.SquareInch), 1e-9)
	// Of two grades at one depth, the stronger classes the section.
	q.Layers[0].Depth = in(21)
	require.InEpsilon(t, 80.0/29000, flexureOf(t, ACI31819(), q).YieldStrain, 1e-12)
	q.Layers[0], q.Layers[1] = q.Layers[1], q.Layers[0]
	require.InEpsilon(t, 80.0/29000, flexureOf(t, ACI31819(), q).YieldStrain, 1e-12)
}

// Bars of a grade of their own are held against the tables, row by row.
func TestGradeOfARow(t *testing.T) {
	for _, tc := range []struct {
		code  Code
		yield float64 // ksi
		want  beam.Outcome
	}{
		{ACI31814(), 80, beam.Pass}, {ACI31814(), 100, beam.Fail}, {ACI31819(), 100, beam.Pass}, {ACI31819(), 110, beam.Fail},
		{ACI31819(), 40, beam.Pass}, {ACI31819(), 39, beam.Fail},
	} {
		row := bottom(3, "#8")
		row.Yield = units.KSI.Of(tc.yield)
		r, _ := checkUS(t, tc.code, []beam.Row{row, top(2, "#4")}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
		require.Equal(t, tc.want, find1(t, r, "flexure.grade").Outcome, "%s, %v ksi", tc.code.e.id, tc.yield)
	}
	r, _ := checkUS(t, ACI31819(), []beam.Row{bottom(3, "#8"), top(2, "#4")}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	require.Empty(t, checksOf(r.Checks, "flexure.grade"))
}

// A small axial compression takes from the strain and nothing from the strength,
// a tension takes from the strength. 14 by 24 in, 4000 psi, 3 #9 of Grade 60 at
// 21.561 in. Own calculation: Pn = Pu/0.9 acts at mid-depth, a = (180 +
// Pn)/47.6 in, Mn = 180 (21.561 - 12) + (180 + Pn)(12 - a/2).
func TestSmallAxialForce(t *testing.T) {
	rows := []beam.Row{bottom(3, "#9"), top(2, "#4")}
	moment := units.KipFoot.Of(100)
	at := func(axial float64) (capacity, strain float64) {
		r, _ := checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: moment, Axial: units.Kip.Of(axial)})
		requireEvaluable(t, find1(t, r, "flexure.positive"))
		requireEvaluable(t, find1(t, r, "flexure.strain.positive"))
		require.Equal(t, beam.Pass, find1(t, r, "flexure.cross-check.positive").Outcome)
		return valueIn(t, find1(t, r, "flexure.positive").Capacity, "kip-ft"), find1(t, r, "flexure.strain.positive").Capacity.SI()
	}
	d := 24 - 1.5 - 0.375 - 0.564
	hand := func(axial float64) (design, strain float64) {
		pn := axial / 0.9
		a := (180 + pn) / 47.6
		c := a / 0.85
		return 0.9 * (180*(d-12) + (180+pn)*(12-a/2)) / 12, 0.003 * (d - c) / c
	}
	bare, strain := at(0)
	want, wantStrain := hand(0)
	require.InEpsilon(t, want, bare, 1e-9)
	require.InEpsilon(t, wantStrain, strain, 1e-9)

	capacity, strain := at(60)
	_, wantStrain = hand(60)
	require.InEpsilon(t, bare, capacity, 1e-9, "compression adds nothing")
	require.InEpsilon(t, wantStrain, strain, 1e-9, "and takes from the strain")

	capacity, strain = at(-60)
	want, _ = hand(-60)
	require.InEpsilon(t, want, capacity, 1e-9)
	require.Less(t, capacity, bare)
	_, bareStrain := hand(0)
	require.InEpsilon(t, bareStrain, strain, 1e-9)

	// More tension than the steel has: nothing balances.
	r, _ := checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: moment, Axial: units.Kip.Of(-170)})
	c := find1(t, r, "flexure.positive")
	require.Equal(t, beam.NoCapacity, c.Utilization)
	require.Contains(t, c.Reason, "axial force")
	// The worst of several demands governs, and the others keep theirs.
	r, _ = checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "bending", Moment: units.KipFoot.Of(150)}, beam.Demand{Name: "pull", Moment: moment, Axial: units.Kip.Of(-130)})
	require.Equal(t, "pull", find1(t, r, "flexure.positive").Combination)
	r, _ = checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "bending", Moment: units.KipFoot.Of(150)}, beam.Demand{Name: "pull", Moment: units.KipFoot.Of(10), Axial: units.Kip.Of(-10)})
	require.Equal(t, "bending", find1(t, r, "flexure.positive").Combination)
	require.InEpsilon(t, bare, valueIn(t, find1(t, r, "flexure.positive").Capacity, "kip-ft"), 1e-9)
	requireEvaluable(t, find1(t, r, "flexure.positive"))
}

// Under 318-14 a compression may take more from φ than it adds to Mn: φ follows the
// strain that the axial force leaves, and is found with
// the force, and the force at nominal strength with it.
func TestAxialForceInTheTransition(t *testing.T) {
	q := teeQuery()
	q.Section = rectangle(in(14), in(24))
	q.Layers = []beam.SteelLayer{{Area: in2(5.2), Depth: in(21), Yield: psi(60000)}}
	q.Demand = beam.Demand{Name: "1", Moment: units.KipFoot.Of(100), Axial: units.Kip.Of(30)}
	f := flexureOf(t, ACI31814(), q)
	require.Equal(t, transition, f.Class)
	pn := 30 / f.Phi
	a := (312 + pn) / 47.6
	require.InEpsilon(t, a, f.BlockDepth.In(units.Inch), 1e-9)
	require.InEpsilon(t, 312*9+(312+pn)*(12-a/2), f.Nominal.In(units.KipInch), 1e-9)
}

// A tension of small eccentricity pulls on the steel of both faces. 14 by 24 in,
// #9 at 21.561 in. and #8 at 2.375 in. from the top, no moment, 80 kip at
// mid-depth: the bottom takes 80 × (12 - 2.375)/(21.561 - 2.375) = 40.134 kip, the
// top the rest. Own calculation.
func TestTensionOnBothFaces(t *testing.T) {
	rows := []beam.Row{bottom(3, "#9"), top(2, "#8")}
	r, _ := checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Axial: units.Kip.Of(-80)})
	shares := checksOf(r.Checks, "flexure.tension")
	require.Len(t, shares, 2)
	d, top1 := 24-1.5-0.375-0.564, 1.5+0.375+0.5
	share := 80 * (12 - top1) / (d - top1)
	require.InEpsilon(t, share, valueIn(t, shares[0].Demand, "kip"), 1e-9)
	require.InEpsilon(t, 0.9*180, valueIn(t, shares[0].Capacity, "kip"), 1e-9)
	require.InEpsilon(t, 80-share, valueIn(t, shares[1].Demand, "kip"), 1e-9)
	require.InEpsilon(t, 0.9*1.58*60, valueIn(t, shares[1].Capacity, "kip"), 1e-9)
	require.Equal(t, beam.Top, shares[1].Face)
	require.Equal(t, beam.Pass, shares[1].Outcome)

	r, _ = checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Axial: units.Kip.Of(-180)})
	require.Equal(t, beam.Fail, checksOf(r.Checks, "flexure.tension")[1].Outcome)
	// A moment that presses on the top leaves it to bending: more than P (d - yc).
	for moment, want := range map[float64]int{80 * (d - 12) * 0.999: 2, 80 * (d - 12) * 1.001: 0} {
		r, _ = checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: units.KipInch.Of(moment), Axial: units.Kip.Of(-80)})
		require.Len(t, checksOf(r.Checks, "flexure.tension"), want)
	}
	r, _ = checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: units.KipInch.Of(10), Axial: units.Kip.Of(80)})
	require.Empty(t, checksOf(r.Checks, "flexure.tension"))
}

// Under axial tension the 4/3 of 9.6.1.3 is not used: the steel required by
// analysis is more than bending alone asks for.
func TestNoWaiverUnderTension(t *testing.T) {
	rows := []beam.Row{bottom(2, "#4"), top(2, "#4")}
	for axial, want := range map[float64]string{0: "9.6.1.3", -5: "9.6.1.2", 5: "9.6.1.3"} {
		r, _ := checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(20), Axial: units.Kip.Of(axial)})
		require.Equal(t, want, find1(t, r, "flexure.minimum.positive").Clause, "%v kip", axial)
	}
}

// The workings of shapes can be computed again: blocks in a flange, below it, in
// sloping sides; several grades; compression steel; with the 4/3 rule.
func TestWorkingsOfShapes(t *testing.T) {
	tee := beam.Section{Shape: beam.Tee, Width: in(12), Depth: in(24), FlangeThickness: in(4), FlangeWidth: in(30)}
	stem := beam.Section{Shape: beam.Tee, Width: in(12), Depth: in(24), FlangeThickness: in(2), FlangeWidth: in(20)}
	upward := polygonOf([2]float64{6, 0}, [2]float64{18, 0}, [2]float64{24, 24}, [2]float64{0, 24})
	downward := polygonOf([2]float64{0, 0}, [2]float64{30, 0}, [2]float64{21, 24}, [2]float64{9, 24})
	house := polygonOf([2]float64{0, 0}, [2]float64{20, 0}, [2]float64{20, 23}, [2]float64{16, 24}, [2]float64{4, 24}, [2]float64{0, 23})
	cap4 := polygonOf([2]float64{6, 0}, [2]float64{18, 0}, [2]float64{18, 18}, [2]float64{24, 22}, [2]float64{24, 24}, [2]float64{0, 24}, [2]float64{0, 22}, [2]float64{6, 18})
	strong := bottom(2, "#8")
	strong.Yield, strong.Layer = units.KSI.Of(80), 2
	relied := top(2, "#7")
	relied.InCompression = true
	for _, c := range Editions() {
		for name, s := range map[string]beam.Section{"tee": tee, "stem": stem, "upward": upward, "downward": downward, "house": house, "cap": cap4} {
			for rows, list := range map[string][]beam.Row{
				"few":    {bottom(2, "#4"), top(2, "#4")},
				"many":   {bottom(4, "#10"), top(2, "#4")},
				"grades": {bottom(2, "#8"), strong, top(2, "#4")},
				"relied": {bottom(4, "#10"), relied},
				"both":   {bottom(2, "#8"), strong, relied},
			} {
				for _, d := range []beam.Demand{
					{Name: "1", Moment: units.KipFoot.Of(60)}, {Name: "1", Moment: units.KipFoot.Of(-20)},
					{Name: "1", Moment: units.KipFoot.Of(60), Axial: units.Kip.Of(-15)},
				} {
					b := demandBrief(d)
					b.Section = s
					r, _ := check(t, c, b, list)
					for i := range r.Checks {
						if got := &r.Checks[i]; len(got.Steps) > 0 && len(got.ID) > 7 && got.ID[:7] == "flexure" {
							requireEvaluable(t, got)
						}
					}
					sense := "positive"
					if d.Moment.Compare(units.Moment{}) < 0 {
						sense = "negative"
					}
					require.Equal(t, beam.Pass, find1(t, r, "flexure.cross-check."+sense).Outcome, "%s, %s", name, rows)
				}
			}
		}
	}
}

// The bound of LeastTension for any stack in either sense: no area below it, at
// any centroid, gives the moment and meets least steel.
func TestLeastTensionOfShapes(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		e := rapid.SampledFrom(Editions()).Draw(t, "code").e
		parts := drawParts(t, true)
		sense := rapid.SampledFrom([]beam.Sense{beam.Positive, beam.Negative}).Draw(t, "sense")
		depth := parts[len(parts)-1].Bottom.Scale(0.93)
		fc, fy := psi(rapid.Float64Range(2600, 9000).Draw(t, "fc")), psi(60000)
		z := e.sizing(parts, sense, fc, fy, depth, depth, false)
		mu := z.nominal(z.axisAt(0.006)) * rapid.Float64Range(0.01, 1).Draw(t, "share")
		if !z.mayCarry(mu) {
			return
		}
		section := mechanics.Section{Parts: parts}
		perDepth := e.minimumSteel(fc, fy, e.minimumWidth(webWidth(section), tensionWidth(section, sense), true), depth).area / z.depth
		bound := z.leastArea(mu, perDepth, e.minimum.waiver)
		for i := 1; i <= 200; i++ {
			at := z
			at.depth = z.depth * float64(i) / 200
			req := at.tension(mu)
			if !req.ok {
				continue
			}
			if need := math.Max(req.area, math.Min(perDepth*at.depth, e.minimum.waiver*req.area)); need < bound*(1-1e-9) {
				t.Fatalf("bound %v, but %v would do at %v", bound, need, at.depth)
			}
		}
	})
}

// Tension steel of a trial for moments along a beam, with compression steel where
// it is relied on, and with an axial force. Put back by hand for a tension: Mu + Pu
// (d - yc) over φ about the steel, and Pu/φ on it.
func TestRequiredAreaOfATrial(t *testing.T) {
	e := ACI31819().e
	relied := top(3, "#9")
	relied.InCompression = true
	_, plain := checkUS(t, ACI31819(), []beam.Row{bottom(4, "#9"), top(2, "#4")}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	_, both := checkUS(t, ACI31819(), []beam.Row{bottom(4, "#9"), relied}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
	d := 24 - 1.5 - 0.375 - 0.564
	steel := func(moment float64) float64 { // kip-in, about the steel, over φ
		a := d - math.Sqrt(d*d-2*moment/47.6)
		return 47.6 * a / 60
	}
	got, ok := e.requiredArea(plain, beam.Positive, units.KipFoot.Of(200), units.Force{})
	require.True(t, ok)
	require.InEpsilon(t, steel(2400/0.9), got.In(units.SquareInch), 1e-9)
	got, ok = e.requiredArea(plain, beam.Positive, units.KipFoot.Of(-200), units.Force{})
	require.True(t, ok)
	require.InEpsilon(t, steel(2400/0.9), got.In(units.SquareInch), 1e-9, "a magnitude")
	got, _ = e.requiredArea(plain, beam.Positive, units.KipFoot.Of(200), units.Kip.Of(20))
	require.InEpsilon(t, steel(2400/0.9), got.In(units.SquareInch), 1e-9, "compression takes nothing off")
	got, _ = e.requiredArea(plain, beam.Positive, units.KipFoot.Of(200), units.Kip.Of(-20))
	require.InEpsilon(t, steel((2400-20*(d-12))/0.9)+20/0.9/60, got.In(units.SquareInch), 1e-9)
	got, _ = e.requiredArea(plain, beam.Positive, units.KipFoot.Of(5), units.Kip.Of(-20))
	require.InEpsilon(t, 20/0.9/60, got.In(units.SquareInch), 1e-9, "all of it, at most")
	got, ok = e.requiredArea(plain, beam.Positive, units.Moment{}, units.Force{})
	require.True(t, ok)
	require.True(t, got.IsZero())

	_, ok = e.requiredArea(plain, beam.Positive, units.KipFoot.Of(480), units.Force{})
	require.False(t, ok)
	got, ok = e.requiredArea(both, beam.Positive, units.KipFoot.Of(480), units.Force{})
	require.True(t, ok)
	s := mechanics.Section{Parts: both.Geometry.Parts, Layers: []mechanics.Layer{
		{Depth: in(d), Area: got, Steel: e.barSteel(psi(60000))}, {Depth: in(1.5 + 0.375 + 0.564), Area: in2(3), Steel: e.barSteel(psi(60000))},
	}}
	f := strengthOf(t, ACI31819(), s, psi(4000), beam.Readings{})
	require.InEpsilon(t, 480, f.Design.In(units.KipFoot), 1e-9)
	_, ok = e.requiredArea(both, beam.Positive, units.KipFoot.Of(2000), units.Force{})
	require.False(t, ok)
	require.Zero(t, testing.AllocsPerRun(50, func() { e.requiredArea(both, beam.Positive, units.KipFoot.Of(480), units.Kip.Of(-5)) }))
}

// The door of bare sections under a small axial force: the lesser strength and the
// lesser strain, the 4/3 rule not under tension, and none at all where nothing
// balances. 14 by 24 in, 3 in2 at 21.5 in.
func TestQueryUnderAxialForce(t *testing.T) {
	at := func(moment, axial, area float64) beam.Strengths {
		q := teeQuery()
		q.Section = rectangle(in(14), in(24))
		q.Layers = []beam.SteelLayer{{Area: in2(area), Depth: in(21.5), Yield: psi(60000)}}
		q.Demand = beam.Demand{Name: "1", Moment: units.KipFoot.Of(moment), Axial: units.Kip.Of(axial)}
		s, err := ACI31819().Strengths(q)
		require.NoError(t, err)
		return s
	}
	bare, pressed, pulled := at(100, 0, 3), at(100, 60, 3), at(100, -60, 3)
	require.Equal(t, bare.Flexure.Design, pressed.Flexure.Design)
	require.Equal(t, bare.Flexure.ExtremeStrain, pressed.Flexure.ExtremeStrain)
	c := (180 + 60/0.9) / 47.6 / 0.85
	require.InEpsilon(t, 0.003*(21.5-c)/c, checkOf(t, pressed.Checks, "flexure.strain.positive").Capacity.SI(), 1e-9)
	a := (180 - 60/0.9) / 47.6
	require.InEpsilon(t, 0.9*(180*9.5+(180-60/0.9)*(12-a/2)), pulled.Flexure.Design.In(units.KipInch), 1e-9)
	require.InEpsilon(t, bare.Flexure.ExtremeStrain, checkOf(t, pulled.Checks, "flexure.strain.positive").Capacity.SI(), 1e-9)

	for _, moment := range []float64{0, 100} {
		none := at(moment, -170, 3)
		require.True(t, none.Flexure.Design.IsZero())
		require.Equal(t, beam.Fail, checkOf(t, none.Checks, "flexure.positive").Outcome)
		require.Equal(t, beam.NoCapacity, checkOf(t, none.Checks, "flexure.positive").Utilization)
	}
	require.Equal(t, "9.6.1.3", checkOf(t, at(20, 0, 0.4).Checks, "flexure.minimum.positive").Clause)
	require.Equal(t, "9.6.1.2", checkOf(t, at(20, -1, 0.4).Checks, "flexure.minimum.positive").Clause)
}

// Steel beside compression steel that is there, in every edition: what is found is
// put back into the kernel.
func TestSteelBesideCompressionSteel(t *testing.T) {
	relied := top(3, "#9")
	relied.InCompression = true
	for _, c := range []Code{ACI31814(), ACI31819()} {
		e, classes := c.e, map[string]int{}
		_, trial := checkUS(t, c, []beam.Row{bottom(4, "#9"), relied}, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
		d := 24 - 1.5 - 0.375 - 0.564
		for moment := 390.0; moment < 640; moment += 10 {
			area, ok := e.requiredArea(trial, beam.Positive, units.KipFoot.Of(moment), units.Force{})
			if !ok {
				continue
			}
			s := mechanics.Section{Parts: trial.Geometry.Parts, Layers: []mechanics.Layer{
				{Depth: in(d), Area: area, Steel: e.barSteel(psi(60000))}, {Depth: in(1.5 + 0.375 + 0.564), Area: in2(3), Steel: e.barSteel(psi(60000))},
			}}
			f := strengthOf(t, c, s, psi(4000), beam.Readings{})
			z := e.trialSizing(trial, beam.Positive)
			if z.tension(moment * 12000).ok {
				s.Layers = s.Layers[:1]
				f = strengthOf(t, c, s, psi(4000), beam.Readings{})
			}
			require.InEpsilon(t, moment, f.Design.In(units.KipFoot), 1e-9)
			classes[f.Class]++
		}
		require.Positive(t, classes[tensionControlled])
	}
}
