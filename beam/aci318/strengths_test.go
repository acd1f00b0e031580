package aci318

import (
	"errors"
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// query is a 16 by 26 in. section with two layers and stirrups.
func query() beam.SectionQuery {
	return beam.SectionQuery{
		Section:  beam.Section{Shape: beam.Rectangular, Width: in(16), Depth: in(26)},
		Concrete: beam.Concrete{Strength: psi(4500)},
		Bending:  beam.Positive,
		Layers: []beam.SteelLayer{
			{Area: in2(3.16), Depth: in(23.5), Yield: psi(60000)},
			{Area: in2(0.40), Depth: in(2.5), Yield: psi(60000)},
		},
		Stirrups: &beam.StirrupSteel{
			Area: in2(0.22), Spacing: in(9), Yield: psi(60000), Cover: in(1.5), Diameter: in(0.375), Across: in(12.6),
		},
		Demand: beam.Demand{Name: "1", Moment: units.KipFoot.Of(250), Shear: units.Kip.Of(45)},
	}
}

func checkOf(t *testing.T, checks []beam.Check, id string) beam.Check {
	t.Helper()
	for _, c := range checks {
		if c.ID == id {
			return c
		}
	}
	require.Fail(t, "no check "+id)
	return beam.Check{}
}

// Own calculation from 22.2, 22.5 and 22.7 of 318-19. The bar at 2.5 in. lies
// inside the block, which is 2.985 in. deep, and does not yield; c follows from
// 0.85 (4.5)(0.825)(16) c² + (0.4 (87 - 3.825) - 189.6) c - 0.4 (87)(2.5) = 0:
// c = 3.61829 in. Shear: Av,min/s = max(0.75 √4500, 50) 16/60000 = 0.013416;
// 0.22/9 = 0.02444 provided; ρw = 3.16/(16 × 23.5) = 0.84 %, below 1.5625 %,
// so that row (a) is the larger: Vc = 2 √4500 × 376 = 50.446 kip; Vs = 0.22 × 60 × 23.5/9
// = 34.467 kip.
func TestStrengthsOfASection(t *testing.T) {
	s, err := ACI31819().Strengths(query())
	require.NoError(t, err)
	require.Empty(t, s.Refusals)
	f := s.Flexure
	k, p, q := 0.85*4.5*0.825*16, 0.4*(87-3.825)-189.6, 0.4*87*2.5
	c := (-p + math.Sqrt(p*p+4*k*q)) / (2 * k)
	require.InEpsilon(t, c, f.NeutralAxis.In(units.Inch), 1e-12)
	require.InEpsilon(t, 0.825, f.BlockFactor, 1e-12)
	require.InEpsilon(t, 23.5, f.EffectiveDepth.In(units.Inch), 1e-12)
	require.Equal(t, tensionControlled, f.Class)
	require.Equal(t, 1, f.Equilibria)
	require.Less(t, f.CrossCheck.Difference, 1e-6)
	require.Equal(t, crossCheckMethod, f.CrossCheck.Method)
	require.Positive(t, f.Layers[0].Strain)
	require.InEpsilon(t, 189.6, f.Layers[0].Force.In(units.Kip), 1e-12)
	require.Negative(t, f.Layers[1].Strain)
	var sum float64
	for _, l := range f.Layers {
		sum += l.Force.In(units.Kip)
	}
	require.InEpsilon(t, k*c, sum, 1e-12, "the layers balance the block")

	v := s.Shear
	require.Equal(t, "a", v.ConcreteRow)
	require.Equal(t, 1.0, v.SizeEffect)
	require.InEpsilon(t, 2*math.Sqrt(4500)*16*23.5/1000, v.Concrete.In(units.Kip), 1e-12)
	require.InEpsilon(t, 0.22*60*23.5/9, v.Steel.In(units.Kip), 1e-12)
	require.InEpsilon(t, 0.75*(v.Concrete.In(units.Kip)+v.Steel.In(units.Kip)), v.Design.In(units.Kip), 1e-12)
	require.InEpsilon(t, 0.75*10*math.Sqrt(4500)*16*23.5/1000, v.SectionLimit.In(units.Kip), 1e-12)
	require.InEpsilon(t, 11.75, v.GreatestSpacing.In(units.Inch), 1e-12)
	require.InEpsilon(t, 23.5, v.GreatestAcross.In(units.Inch), 1e-12)

	tor := s.Torsion
	require.InEpsilon(t, 416.0, tor.Area.In(units.SquareInch), 1e-12)
	require.InEpsilon(t, 84.0, tor.Perimeter.In(units.Inch), 1e-12)
	require.InEpsilon(t, math.Sqrt(4500)*416*416/84, tor.Threshold.In(units.PoundInch), 1e-12)
	require.InEpsilon(t, 4.0, tor.Cracking.Ratio(tor.Threshold), 1e-12)
	require.True(t, tor.MayBeNeglected)

	for _, id := range []string{
		"flexure.positive", "flexure.strain.positive", "flexure.minimum.positive",
		"shear.strength", "shear.section-limit", "shear.minimum-stirrups", "shear.spacing-along", "shear.spacing-across",
	} {
		require.Equal(t, beam.Pass, checkOf(t, s.Checks, id).Outcome, id)
	}
}

func TestStrengthsWithoutDemandOrStirrups(t *testing.T) {
	q := query()
	q.Stirrups, q.Demand = nil, beam.Demand{}
	s, err := ACI31819().Strengths(q)
	require.NoError(t, err)
	require.Empty(t, s.Checks)
	require.Equal(t, "c", s.Shear.ConcreteRow)
	require.InEpsilon(t, math.Sqrt(2/(1+23.5/10)), s.Shear.SizeEffect, 1e-12) // 22.5.5.1.3
	require.True(t, s.Shear.Steel.IsZero())

	q.Demand = beam.Demand{Shear: units.Kip.Of(45)}
	s, err = ACI31819().Strengths(q)
	require.NoError(t, err)
	require.Equal(t, beam.Fail, checkOf(t, s.Checks, "shear.minimum-stirrups").Outcome)
}

// What 9.6 asks at a demand: the waiver of 9.6.1.3, stirrups that strength or
// 9.6.3.1 calls for or not, legs whose distance is not known.
func TestStrengthsJudgeDetailing(t *testing.T) {
	q := query()
	q.Layers = []beam.SteelLayer{{Area: in2(0.9), Depth: in(23.5), Yield: psi(60000)}}
	q.Demand.Moment = units.KipFoot.Of(60)
	s, err := ACI31819().Strengths(q)
	require.NoError(t, err)
	c := checkOf(t, s.Checks, "flexure.minimum.positive")
	require.Equal(t, "9.6.1.3", c.Clause)
	require.Equal(t, beam.Pass, c.Outcome)
	q.Demand.Moment = units.KipFoot.Of(90)
	s, err = ACI31819().Strengths(q)
	require.NoError(t, err)
	c = checkOf(t, s.Checks, "flexure.minimum.positive")
	require.Equal(t, beam.Fail, c.Outcome)

	// As,min = 3 √4500/60000 × 16 × 23.5 = 1.2611 in2; for 120 kip-ft 4/3 of
	// what is required is more.
	q.Demand.Moment = units.KipFoot.Of(120)
	s, err = ACI31819().Strengths(q)
	require.NoError(t, err)
	c = checkOf(t, s.Checks, "flexure.minimum.positive")
	require.Equal(t, "9.6.1.2", c.Clause)
	require.InEpsilon(t, 3*math.Sqrt(4500)/60000*16*23.5, units.SquareMetre.Of(c.Demand.SI()).In(units.SquareInch), 1e-12)

	q = query()
	q.Demand.Shear = units.Kip.Of(5) // below φλ√f'c bw d = 18.9 kip
	s, err = ACI31819().Strengths(q)
	require.NoError(t, err)
	require.Equal(t, beam.NotApplicable, checkOf(t, s.Checks, "shear.spacing-along").Outcome)
	q.Demand.Shear, q.Stirrups.Across = units.Kip.Of(40), units.Length{}
	s, err = ACI31819().Strengths(q)
	require.NoError(t, err)
	require.Equal(t, beam.NotJudged, checkOf(t, s.Checks, "shear.spacing-across").Outcome)
	s, err = ACI31814().Strengths(q) // 318-14 has no such rule
	require.NoError(t, err)
	for _, c := range s.Checks {
		require.NotEqual(t, "shear.spacing-across", c.ID)
	}
}

// The depth of a layer is measured from the top for either sense.
func TestStrengthsInNegativeBending(t *testing.T) {
	q := query()
	q.Demand = beam.Demand{}
	up, err := ACI31819().Strengths(q)
	require.NoError(t, err)
	q.Bending = beam.Negative
	q.Layers[0].Depth, q.Layers[1].Depth = in(2.5), in(23.5)
	down, err := ACI31819().Strengths(q)
	require.NoError(t, err)
	require.InEpsilon(t, up.Flexure.Nominal.In(units.KipFoot), down.Flexure.Nominal.In(units.KipFoot), 1e-12)
	require.InEpsilon(t, up.Shear.Concrete.In(units.Kip), down.Shear.Concrete.In(units.Kip), 1e-12)
}

func TestStrengthsRefuses(t *testing.T) {
	for _, tc := range []struct {
		name string
		edit func(q *beam.SectionQuery)
		rule string
	}{
		{"weak concrete", func(q *beam.SectionQuery) { q.Concrete.Strength = psi(2400) }, "scope.concrete-strength"},
		{"strong bars", func(q *beam.SectionQuery) { q.Layers[1].Yield = psi(110000) }, "scope.steel-grade"},
		{"soft bars", func(q *beam.SectionQuery) { q.Layers[0].Yield = psi(33000) }, "scope.steel-grade"},
		// 0.10 f'c Ag = 0.1 × 4500 × 416 = 187.2 kip, refused when reached.
		{"axial compression", func(q *beam.SectionQuery) { q.Demand.Axial = units.PoundForce.Of(187200) }, "scope.axial"},
	} {
		t.Run(tc.name, func(t *testing.T) {
			q := query()
			tc.edit(&q)
			s, err := ACI31819().Strengths(q)
			require.NoError(t, err)
			require.NotEmpty(t, s.Refusals)
			require.Equal(t, tc.rule, s.Refusals[0].Rule)
			require.Empty(t, s.Checks)
			require.Zero(t, s.Flexure.Nominal)
		})
	}
	q := query()
	q.Demand.Torque, q.Demand.Axial = units.PoundInch.Of(103000), units.Kip.Of(187)
	s, err := ACI31819().Strengths(q)
	require.NoError(t, err)
	require.Empty(t, s.Refusals)
	require.Equal(t, beam.Pass, checkOf(t, s.Checks, "torsion.threshold").Outcome)
}

func TestStrengthsFaults(t *testing.T) {
	for _, tc := range []struct {
		name, path string
		edit       func(q *beam.SectionQuery)
	}{
		{"no width", "/section/width", func(q *beam.SectionQuery) { q.Section.Width = units.Length{} }},
		{"NaN depth", "/section/depth", func(q *beam.SectionQuery) { q.Section.Depth = in(math.NaN()) }},
		{"infinite strength", "/concrete/strength", func(q *beam.SectionQuery) { q.Concrete.Strength = psi(math.Inf(1)) }},
		{"lightweight without density", "/concrete/density", func(q *beam.SectionQuery) { q.Concrete.Kind = beam.SandLightweight }},
		{"no layers", "/layers", func(q *beam.SectionQuery) { q.Layers = nil }},
		{"layer outside", "/layers/0/depth", func(q *beam.SectionQuery) { q.Layers[0].Depth = in(27) }},
		{"layer without area", "/layers/1/area", func(q *beam.SectionQuery) { q.Layers[1].Area = units.Area{} }},
		{"layer without yield", "/layers/1/yield", func(q *beam.SectionQuery) { q.Layers[1].Yield = units.Stress{} }},
		{"stirrups without spacing", "/stirrups/spacing", func(q *beam.SectionQuery) { q.Stirrups.Spacing = units.Length{} }},
		{"huge moment", "/demand/moment", func(q *beam.SectionQuery) { q.Demand.Moment = units.KipFoot.Of(1e12) }},
		{"moment of the other sense", "/demand/moment", func(q *beam.SectionQuery) { q.Demand.Moment = units.KipFoot.Of(-5) }},
		{"unknown sense", "/bending", func(q *beam.SectionQuery) { q.Bending = 9 }},
		{"unknown shape", "/section/shape", func(q *beam.SectionQuery) { q.Section.Shape = 9 }},
		{"no layer pulls", "/layers", func(q *beam.SectionQuery) {
			q.Layers = []beam.SteelLayer{{Area: in2(1), Depth: units.Length{}, Yield: psi(60000)}}
		}},
	} {
		t.Run(tc.name, func(t *testing.T) {
			q := query()
			q.Demand.Name = ""
			q.Layers = append([]beam.SteelLayer(nil), q.Layers...)
			tc.edit(&q)
			_, err := ACI31819().Strengths(q)
			var input *beam.InputError
			require.True(t, errors.As(err, &input), "%v", err)
			var paths []string
			for _, f := range input.Faults {
				paths = append(paths, f.Path)
				require.NotEmpty(t, f.Detail)
				require.NotEmpty(t, f.Allowed)
			}
			require.Contains(t, paths, tc.path)
		})
	}
}

// Where deducting the displaced concrete gives two equilibria, the result says
// which it took. A heavy layer is moved through the depths at which the block
// may end until that happens.
func TestStrengthsSayWhenTwoEquilibriaExist(t *testing.T) {
	q := query()
	q.Demand, q.Stirrups = beam.Demand{}, nil
	found := false
	for d := 2.0; d < 8 && !found; d += 0.01 {
		q.Layers = []beam.SteelLayer{{Area: in2(5.4), Depth: in(23.5), Yield: psi(60000)}, {Area: in2(6), Depth: in(d), Yield: psi(60000)}}
		s, err := ACI31819().Strengths(q)
		require.NoError(t, err)
		if s.Flexure.Equilibria > 1 {
			require.NotEmpty(t, s.Notes)
			found = true
		}
	}
	require.True(t, found)
}

// A hanger layer that happens to lie just below the neutral axis is no tension
// reinforcement: d, ρw and least steel go by the layers beyond mid-depth
// (ACI 318-19 R22.5.5.1 counts bars farther than two-thirds of the depth).
func TestStretchedHangerIsNoTensionSteel(t *testing.T) {
	q := beam.SectionQuery{
		Section:  beam.Section{Shape: beam.Rectangular, Width: units.Inch.Of(14), Depth: units.Inch.Of(24)},
		Concrete: beam.Concrete{Strength: units.PSI.Of(4000)}, Bending: beam.Positive,
		Layers: []beam.SteelLayer{{Area: units.SquareInch.Of(0.62), Depth: units.Inch.Of(21.8), Yield: units.KSI.Of(60)}},
		Demand: beam.Demand{Moment: units.KipFoot.Of(58)},
	}
	alone, err := ACI31819().Strengths(q)
	require.NoError(t, err)
	q.Layers = append(q.Layers, beam.SteelLayer{Area: units.SquareInch.Of(0.62), Depth: units.Inch.Of(2.2), Yield: units.KSI.Of(60)})
	with, err := ACI31819().Strengths(q)
	require.NoError(t, err)
	require.InEpsilon(t, 21.8, with.Flexure.EffectiveDepth.In(units.Inch), 1e-12)
	require.Equal(t, alone.Flexure.TensionSteel, with.Flexure.TensionSteel)
	require.Equal(t, alone.Flexure.MinimumSteel, with.Flexure.MinimumSteel)
	// 200/60000 × 14 × 21.8 = 1.017 in2 against 0.62 (own calculation from 9.6.1.2)
	for _, c := range with.Checks {
		if c.ID == "flexure.minimum.positive" {
			require.Equal(t, beam.Fail, c.Outcome)
		}
	}
}
