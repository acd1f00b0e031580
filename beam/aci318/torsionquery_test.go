package aci318

import (
	"math"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// twistedQuery is 16 by 26 in. of 4500 psi with closed No. 4 stirrups at 5 in.:
// x1 = 12.5, y1 = 22.5, Aoh = 281.25, ph = 70, Ao = 239.0625.
func twistedQuery() beam.SectionQuery {
	q := query()
	q.Layers = []beam.SteelLayer{
		{Area: in2(3.16), Depth: in(23.5), Yield: psi(60000)},
		{Area: in2(0.62), Depth: in(13), Yield: psi(60000)},
		{Area: in2(1.32), Depth: in(2.5), Yield: psi(60000)},
	}
	q.Stirrups = &beam.StirrupSteel{Area: in2(0.40), Spacing: in(5), Yield: psi(60000), Cover: in(1.5), Diameter: in(0.5), Across: in(12.5)}
	q.Demand = beam.Demand{Name: "1", Moment: units.KipFoot.Of(150), Shear: units.Kip.Of(20), Torque: units.KipFoot.Of(30)}
	return q
}

func twistedStrengths(t testing.TB, c Code, edit func(q *beam.SectionQuery)) beam.Strengths {
	t.Helper()
	q := twistedQuery()
	if edit != nil {
		edit(&q)
	}
	s, err := c.Strengths(q)
	require.NoError(t, err)
	require.Empty(t, s.Refusals)
	return s
}

// Every value of torsion, by hand from 22.7.
func TestTorsionStrengths(t *testing.T) {
	s := twistedStrengths(t, ACI31814(), nil)
	v := s.Torsion
	root := math.Sqrt(4500)
	at := 30 * 12000 / (2 * 0.75 * 239.0625 * 60000)
	least := 5*root*416/60000 - at*70
	for name, c := range map[string][2]float64{
		"Acp": {416, v.Area.In(units.SquareInch)}, "pcp": {84, v.Perimeter.In(units.Inch)},
		"Tth": {root * 416 * 416 / 84, v.Threshold.In(units.PoundInch)}, "Tcr": {4 * root * 416 * 416 / 84, v.Cracking.In(units.PoundInch)},
		"Tu": {360000, v.Torque.In(units.PoundInch)}, "Aoh": {281.25, v.StirrupArea.In(units.SquareInch)},
		"ph": {70, v.StirrupPerimeter.In(units.Inch)}, "Ao": {239.0625, v.FlowArea.In(units.SquareInch)}, "θ": {45, v.Angle},
		"v": {math.Hypot(20000/(16*23.5), 360000*70/(1.7*281.25*281.25)), v.Section.In(units.PSI)}, "v,max": {0.75 * 10 * root, v.SectionLimit.In(units.PSI)},
		"At/s": {at, v.Transverse.In(units.SquareInchPerInch)}, "outer leg": {at, v.OuterLeg.In(units.SquareInchPerInch)},
		"its area": {0.04, v.OuterLegProvided.In(units.SquareInchPerInch)}, "least": {0.75 * root * 16 / 60000, v.MinimumTransverse.In(units.SquareInchPerInch)},
		"s,max": {8.75, v.GreatestSpacing.In(units.Inch)}, "Al": {at * 70, v.Longitudinal.In(units.SquareInch)}, "Al,min": {least, v.MinimumLongitudinal.In(units.SquareInch)},
		"φ": {0.75, v.Phi}, "φTn": {0.75 * v.Nominal.In(units.PoundInch), v.Design.In(units.PoundInch)},
	} {
		require.InEpsilon(t, c[0], c[1], 1e-9, name)
	}
	require.False(t, v.FlangeCounted || v.Hollow || v.MayBeNeglected)
	require.Zero(t, v.Shed)
	require.Empty(t, v.Notes)

	// Each half has half of Al; of the lower one bending takes its part, the
	// upper one the moment relieves.
	bending := s.Flexure.TensionSteel.In(units.SquareInch) * 150 / s.Flexure.Design.In(units.KipFoot)
	relief := 150 * 12000 / (0.9 * s.Flexure.EffectiveDepth.In(units.Inch) * 60000)
	c := checkOf(t, s.Checks, "torsion.longitudinal.bottom")
	require.InEpsilon(t, at*70/2+bending, valueIn(t, c.Demand, "in2"), 1e-9)
	require.InEpsilon(t, 3.16+0.31, valueIn(t, c.Capacity, "in2"), 1e-9, "the layer at mid-depth is shared")
	c = checkOf(t, s.Checks, "torsion.longitudinal.top")
	require.InEpsilon(t, max(at*70/2-relief, least/2), valueIn(t, c.Demand, "in2"), 1e-9)
	for _, c := range s.Checks {
		require.NotEqual(t, beam.Fail, c.Outcome, c.ID)
	}

	// By the legs 2 Ao fyt 0.04, by the bars what bending leaves of the lower
	// half, or of the upper one with what the moment relieves of it.
	legs := 2 * 239.0625 * 60000 * 0.04
	upper := 1.32 + 0.31 + min(relief, at*70/2-least/2)
	bars := 2 * 239.0625 * 60000 / 70 * 2 * min(3.47-bending, upper)
	require.Less(t, legs, bars)
	require.InEpsilon(t, legs, v.Nominal.In(units.PoundInch), 1e-9)
	s = twistedStrengths(t, ACI31814(), func(q *beam.SectionQuery) { q.Stirrups.Area = in2(0.8) })
	require.Less(t, bars, 2*legs)
	require.InEpsilon(t, bars, s.Torsion.Nominal.In(units.PoundInch), 1e-9, "the bars govern")
}

// The strength is reached with the torque that equals it.
func TestTorsionStrengthIsReached(t *testing.T) {
	for _, c := range Editions() {
		design := twistedStrengths(t, c, func(q *beam.SectionQuery) { q.Demand.Torque, q.Demand.Shear = units.Moment{}, units.Kip.Of(70) }).Torsion.Design
		for _, share := range []float64{0.999, 1.02} {
			s := twistedStrengths(t, c, func(q *beam.SectionQuery) { q.Demand.Torque, q.Demand.Shear = design.Scale(share), units.Kip.Of(70) })
			fails := false
			for _, k := range s.Checks {
				fails = fails || k.Outcome == beam.Fail && k.ID != "shear.strength" && k.ID != "torsion.section"
			}
			require.Equal(t, share > 1, fails, "%s, %g", c.e.id, share)
		}
	}
}

// What must not pass.
func TestTorsionStrengthsThatAreNone(t *testing.T) {
	for _, tc := range []struct {
		name string
		edit func(q *beam.SectionQuery)
		id   string
	}{
		{"no stirrups", func(q *beam.SectionQuery) { q.Stirrups = nil }, "torsion.closed"},
		{"open stirrups", func(q *beam.SectionQuery) { q.Stirrups.Open = true }, "torsion.closed"},
		{"open stirrups in the legs", func(q *beam.SectionQuery) { q.Stirrups.Open = true }, "torsion.transverse"},
		{"inclined stirrups", func(q *beam.SectionQuery) { q.Stirrups.Angle = 60 }, "torsion.closed"},
		{"wide stirrups", func(q *beam.SectionQuery) { q.Stirrups.Spacing, q.Stirrups.Area = in(8.76), in2(0.8) }, "torsion.spacing-along"},
		{"few stirrups", func(q *beam.SectionQuery) { q.Demand.Torque = units.KipFoot.Of(10); q.Stirrups.Area = in2(0.06) }, "torsion.minimum-stirrups"},
		{"inner legs", func(q *beam.SectionQuery) { q.Stirrups.Legs = 6 }, "torsion.transverse"},
		{"cover without room", func(q *beam.SectionQuery) { q.Stirrups.Cover = in(8) }, "torsion.section"},
		{"cover without room for legs", func(q *beam.SectionQuery) { q.Stirrups.Cover = in(8) }, "torsion.transverse"},
		{"no top steel", func(q *beam.SectionQuery) { q.Layers = q.Layers[:1] }, "torsion.longitudinal.top"},
		{"no steel left by bending", func(q *beam.SectionQuery) { q.Demand.Moment = units.KipFoot.Of(340) }, "torsion.longitudinal.bottom"},
		{"too much moment", func(q *beam.SectionQuery) { q.Demand.Moment = units.KipFoot.Of(500) }, "torsion.longitudinal.bottom"},
		{"section", func(q *beam.SectionQuery) { q.Demand.Torque = units.KipFoot.Of(100) }, "torsion.section"},
		{"wall of a box", func(q *beam.SectionQuery) {
			q.Section = box(5)
			for i := range q.Layers {
				q.Layers[i].Area = in2(8)
			}
			q.Layers[0].Depth, q.Demand.Torque = in(37), units.KipFoot.Of(80)
		}, "torsion.wall"},
	} {
		t.Run(tc.name, func(t *testing.T) {
			s := twistedStrengths(t, ACI31819(), tc.edit)
			require.Equal(t, beam.Fail, checkOf(t, s.Checks, tc.id).Outcome)
			for _, c := range s.Checks {
				require.Equal(t, "1", c.Combination, c.ID)
				switch c.ID {
				case "torsion.longitudinal.bottom":
					require.Equal(t, beam.Bottom, c.Face)
				case "torsion.longitudinal.top":
					require.Equal(t, beam.Top, c.Face)
				}
			}
			require.False(t, math.IsNaN(s.Torsion.Design.In(units.KipFoot)) || math.IsInf(s.Torsion.Design.In(units.KipFoot), 0))
		})
	}
	open := twistedStrengths(t, ACI31819(), func(q *beam.SectionQuery) { q.Stirrups.Open = true })
	require.Zero(t, open.Torsion.Nominal)
	require.Equal(t, []string{noteOpen}, open.Torsion.Notes)
	require.Equal(t, noteOpen, checkOf(t, open.Checks, "torsion.transverse").Reason)
	none := twistedStrengths(t, ACI31819(), func(q *beam.SectionQuery) { q.Layers = q.Layers[:1] })
	require.Equal(t, "no longitudinal steel lies in this half of the section", checkOf(t, none.Checks, "torsion.longitudinal.top").Reason)
	bare := twistedStrengths(t, ACI31819(), func(q *beam.SectionQuery) { q.Stirrups = nil })
	require.Equal(t, []string{"without closed stirrups a section has no strength in torsion beyond its threshold"}, bare.Torsion.Notes)
	beyond := twistedStrengths(t, ACI31819(), func(q *beam.SectionQuery) { q.Demand.Moment = units.KipFoot.Of(500) })
	require.Equal(t, noteBeyondBending, checkOf(t, beyond.Checks, "torsion.longitudinal.bottom").Reason)
}

// A torque of compatibility is cut to φTcr, and the rest is reported.
func TestTorsionStrengthsShed(t *testing.T) {
	s := twistedStrengths(t, ACI31819(), func(q *beam.SectionQuery) {
		q.Demand.Torque, q.Demand.Path = units.KipFoot.Of(60), beam.CompatibilityTorque
	})
	crack := 0.75 * s.Torsion.Cracking.In(units.KipFoot)
	require.InEpsilon(t, crack, s.Torsion.Torque.In(units.KipFoot), 1e-12)
	require.InEpsilon(t, 60-crack, s.Torsion.Shed.In(units.KipFoot), 1e-12)
	require.Contains(t, s.Torsion.Notes, noteShed)
}

// What the stirrups enclose must be known to design for a torque, and only
// then; θ must be one that the code allows.
func TestTorsionStrengthsFaults(t *testing.T) {
	for path, edit := range map[string]func(q *beam.SectionQuery){
		"/stirrups/cover":    func(q *beam.SectionQuery) { q.Stirrups.Cover = units.Length{} },
		"/stirrups/diameter": func(q *beam.SectionQuery) { q.Stirrups.Diameter = units.Length{} },
		"/torsion_angle":     func(q *beam.SectionQuery) { q.Readings.TorsionAngle = 61 },
	} {
		q := twistedQuery()
		edit(&q)
		_, err := ACI31819().Strengths(q)
		var input *beam.InputError
		require.ErrorAs(t, err, &input, path)
		require.Len(t, input.Faults, 1)
		require.Equal(t, path, input.Faults[0].Path)
	}
	s := twistedStrengths(t, ACI31819(), func(q *beam.SectionQuery) {
		q.Demand.Torque, q.Stirrups.Cover = units.KipFoot.Of(5), units.Length{}
	})
	require.True(t, s.Torsion.MayBeNeglected)
	require.Zero(t, s.Torsion.Nominal)
	require.Len(t, s.Torsion.Notes, 1)
	require.Equal(t, beam.Pass, checkOf(t, s.Checks, "torsion.threshold").Outcome)
}

// Axial tension takes steel of both halves. Own statics: 150 kip pull at
// mid-depth of 14 by 24 in. and 10 kip-ft with them, between steel at 21.5 in.
// and at 2.5 in.: (150 × 9.5 + 120)/19 = 81.32 kip fall on the bottom, the rest
// on the top, each with half of Al.
func TestTorsionStrengthsUnderAxialTension(t *testing.T) {
	pulled := func(moment, axial, lower, upper float64) beam.Strengths {
		return twistedStrengths(t, ACI31819(), func(q *beam.SectionQuery) {
			q.Section = beam.Section{Shape: beam.Rectangular, Width: in(14), Depth: in(24)}
			q.Concrete.Strength = psi(4000)
			q.Layers = []beam.SteelLayer{{Area: in2(lower), Depth: in(21.5), Yield: psi(60000)}, {Area: in2(upper), Depth: in(2.5), Yield: psi(60000)}}
			q.Demand = beam.Demand{Moment: units.KipFoot.Of(moment), Torque: units.KipFoot.Of(15), Shear: units.Kip.Of(5), Axial: units.Kip.Of(-axial)}
			if moment < 0 {
				q.Bending = beam.Negative
				q.Layers[0].Area, q.Layers[1].Area = q.Layers[1].Area, q.Layers[0].Area
			}
		})
	}
	s := pulled(10, 150, 2, 4)
	half := s.Torsion.Longitudinal.In(units.SquareInch) / 2
	require.InEpsilon(t, 1.0931/2, half, 1e-4)
	need := map[string]float64{"torsion.longitudinal.bottom": (150*9.5+120)/19/54 + half, "torsion.longitudinal.top": (150*9.5-120)/19/54 + half}
	for id, want := range need {
		require.InEpsilon(t, want, valueIn(t, checkOf(t, s.Checks, id).Demand, "in2"), 1e-9, id)
	}
	require.Equal(t, beam.Fail, checkOf(t, s.Checks, "torsion.longitudinal.bottom").Outcome)
	require.Equal(t, beam.Pass, checkOf(t, s.Checks, "torsion.longitudinal.top").Outcome)
	s = pulled(-10, 150, 2, 4)
	require.InEpsilon(t, need["torsion.longitudinal.bottom"], valueIn(t, checkOf(t, s.Checks, "torsion.longitudinal.top").Demand, "in2"), 1e-9, "hogging")
	require.InEpsilon(t, need["torsion.longitudinal.top"], valueIn(t, checkOf(t, s.Checks, "torsion.longitudinal.bottom").Demand, "in2"), 1e-9, "hogging")

	// 20 kip act beyond the bottom steel with 60 kip-ft: about that steel they
	// leave 60 - 20 × 9.5/12 kip-ft, which press on the top.
	s = pulled(60, 20, 2, 4)
	about := (60*12 - 20*9.5) * 1000.0
	rn := about / (0.9 * 14 * 21.5 * 21.5)
	as := 0.85*4000/60000*(1-math.Sqrt(1-2*rn/(0.85*4000)))*14*21.5 + 20/54.0
	require.InEpsilon(t, as+half, valueIn(t, checkOf(t, s.Checks, "torsion.longitudinal.bottom").Demand, "in2"), 1e-9)
	least := s.Torsion.MinimumLongitudinal.In(units.SquareInch) / 2
	require.InEpsilon(t, max(least, half-about/(0.9*21.5*60000)), valueIn(t, checkOf(t, s.Checks, "torsion.longitudinal.top").Demand, "in2"), 1e-9)

	// Tension alone falls on both by their distance from mid-depth.
	s = pulled(0, 100, 2, 4)
	for id := range need {
		require.InEpsilon(t, 50/54.0+half, valueIn(t, checkOf(t, s.Checks, id).Demand, "in2"), 1e-9, id)
	}
	beyond := checkOf(t, pulled(190, 20, 2.2, 4).Checks, "torsion.longitudinal.bottom")
	require.Equal(t, noteBeyondBending, beyond.Reason, "more than the section bears")
	require.Empty(t, checkOf(t, pulled(100, 20, 2.2, 4).Checks, "torsion.longitudinal.bottom").Reason)
}

// Layers do not show where bars lie round the section: that is said, and what
// they leave open with it (9.7.5.1, 9.7.5.2).
func TestTorsionStrengthsNameWhatLayersDoNotShow(t *testing.T) {
	arrangement := []string{"torsion.longitudinal-spacing", "torsion.corners", "torsion.bar-diameter"}
	for gap, says := range map[float64]bool{12: false, 12.01: true} {
		s := twistedStrengths(t, ACI31819(), func(q *beam.SectionQuery) {
			q.Layers[1].Depth = in(2.5 + gap)
			q.Layers[0], q.Layers[2] = q.Layers[2], q.Layers[0]
		})
		for _, id := range arrangement {
			require.Equal(t, beam.NotJudged, checkOf(t, s.Checks, id).Outcome, id)
		}
		reason := checkOf(t, s.Checks, arrangement[0]).Reason
		require.Contains(t, reason, "no more than 12 in")
		require.Equal(t, says, strings.Contains(reason, "leave 12.01 in"), "%g", gap)
		require.Contains(t, checkOf(t, s.Checks, arrangement[2]).Reason, "0.375 in")
	}
	s := twistedStrengths(t, ACI31819(), func(q *beam.SectionQuery) { q.Demand.Torque = units.KipFoot.Of(5) })
	for _, c := range s.Checks {
		require.NotContains(t, arrangement, c.ID, "a torque that is neglected asks for none of it")
	}
}

// Layers of several grades count with the least of their yield strengths, and an
// angle of 90 degrees is upright.
func TestTorsionStrengthsOfSeveralGrades(t *testing.T) {
	whole := twistedStrengths(t, ACI31819(), nil)
	for i := range 3 {
		s := twistedStrengths(t, ACI31819(), func(q *beam.SectionQuery) { q.Layers[i].Yield, q.Stirrups.Angle = psi(40000), 90 })
		require.InEpsilon(t, 1.5*whole.Torsion.Longitudinal.In(units.SquareInch), s.Torsion.Longitudinal.In(units.SquareInch), 1e-9, "layer %d", i)
		require.Equal(t, beam.Pass, checkOf(t, s.Checks, "torsion.closed").Outcome)
	}
	leaning := twistedStrengths(t, ACI31819(), func(q *beam.SectionQuery) { q.Stirrups.Angle = 89 })
	require.Equal(t, noteTorsionInclined, checkOf(t, leaning.Checks, "torsion.closed").Reason)
}
