package aci318

import (
	"errors"
	"math"
	"slices"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// strengthsOf are the strengths of a query that must have some.
func strengthsOf(t *testing.T, c Code, q beam.SectionQuery) beam.Strengths {
	t.Helper()
	s, err := c.Strengths(q)
	require.NoError(t, err)
	require.Empty(t, s.Refusals)
	return s
}

// The section of query(), 16 by 26 in. of 4500 psi with d = 23.5 in. and No. 3
// stirrups at 9 in.: Vs = 0.22 × 60,000 × 23.5/9 × (sin α + cos α).
func TestStrengthsWithInclinedStirrups(t *testing.T) {
	upright := 0.22 * 60 * 23.5 / 9
	for _, k := range []struct {
		angle, lever float64
		row          string
		angleCheck   beam.Outcome // zero: not asked
	}{
		{0, 1, "a", 0},
		{90, 1, "a", 0},
		{60, 0.5 + math.Sqrt(3)/2, "a", beam.Pass},
		{45, math.Sqrt2, "a", beam.Pass},
		{44, 0, "c", beam.Fail},
	} {
		q := query()
		q.Stirrups.Angle = k.angle
		s := strengthsOf(t, ACI31819(), q)
		require.InDelta(t, upright*k.lever, s.Shear.Steel.In(units.Kip), 1e-9, "%g", k.angle)
		require.Equal(t, k.row, s.Shear.ConcreteRow)
		if k.angleCheck == 0 {
			for _, c := range s.Checks {
				require.NotEqual(t, "shear.stirrup-angle", c.ID)
				require.NotEqual(t, "shear.spacing-inclined", c.ID)
			}
			continue
		}
		c := checkOf(t, s.Checks, "shear.stirrup-angle")
		require.Equal(t, k.angleCheck, c.Outcome)
		require.Equal(t, "22.5.8.5.2", c.Clause)
		c = checkOf(t, s.Checks, "shear.spacing-inclined")
		require.InEpsilon(t, 11.75*(1+1/math.Tan(k.angle*math.Pi/180)), valueIn(t, c.Capacity, "in"), 1e-9)
		require.Equal(t, k.angle < 45, contains(s.Shear.Notes, "flatter than 45 degrees"))
	}
}

func contains(notes []string, words string) bool {
	return slices.ContainsFunc(notes, func(n string) bool { return strings.Contains(n, words) })
}

// Bent bars at a section: Av fy sin α, or a series Av fy (sin α + cos α) d/s no
// further apart than 3/8 d (1 + cot α).
func TestStrengthsWithBentBars(t *testing.T) {
	stirrups := 0.22 * 60 * 23.5 / 9
	for _, k := range []struct {
		name string
		bent beam.BentSteel
		code Code
		want float64 // kip beside the stirrups
		says string
		fail string // the check that fails; none
	}{
		{"single", beam.BentSteel{Area: in2(0.79), Yield: psi(60000), Angle: 45}, ACI31819(), 0.79 * 60 * math.Sqrt2 / 2, "central three quarters", ""},
		// 3 √4500 × 16 × 23.5 = 75.7 kip
		{"single, capped", beam.BentSteel{Area: in2(3.16), Yield: psi(60000), Angle: 45}, ACI31814(), 3 * math.Sqrt(4500) * 16 * 23.5 / 1000, "no more than 3 √f'c bw d (22.5.10.6.2)", ""},
		{"single of 80 ksi", beam.BentSteel{Area: in2(0.79), Yield: psi(80000), Angle: 30}, ACI31819(), 0.79 * 60 * 0.5, "in shear (Table 20.2.2.4(a))", ""},
		{"single, flat", beam.BentSteel{Area: in2(0.79), Yield: psi(60000), Angle: 29}, ACI31819(), 0, "too flat", "shear.bent-angle"},
		{"series", beam.BentSteel{Area: in2(0.62), Yield: psi(60000), Angle: 45, Spacing: in(17.625)}, ACI31819(), 0.62 * 60 * math.Sqrt2 * 23.5 / 17.625, "central three quarters", ""},
		{"series, wide", beam.BentSteel{Area: in2(0.62), Yield: psi(60000), Angle: 45, Spacing: in(17.63)}, ACI31819(), 0, "too far apart", "shear.bent-spacing"},
	} {
		t.Run(k.name, func(t *testing.T) {
			q := query()
			q.Bent = &k.bent
			s := strengthsOf(t, k.code, q)
			require.InEpsilon(t, stirrups+k.want, s.Shear.Steel.In(units.Kip), 1e-9)
			require.InEpsilon(t, s.Shear.Concrete.Add(s.Shear.Steel).In(units.Kip), s.Shear.Nominal.In(units.Kip), 1e-12)
			require.InEpsilon(t, 0.75*s.Shear.Nominal.In(units.Kip), s.Shear.Design.In(units.Kip), 1e-12)
			require.True(t, contains(s.Shear.Notes, k.says), "%v", s.Shear.Notes)
			require.Equal(t, k.want > 0, contains(s.Shear.Notes, "central three quarters"))
			require.Equal(t, k.bent.Yield == psi(80000), contains(s.Shear.Notes, "bent bars count with 60000 psi"))
			for _, c := range s.Checks {
				if c.ID == "shear.bent-angle" || c.ID == "shear.bent-spacing" {
					require.Equal(t, c.ID == k.fail, c.Outcome == beam.Fail, c.ID)
				}
			}
			if !k.bent.Spacing.IsZero() {
				require.InEpsilon(t, 17.625, valueIn(t, checkOf(t, s.Checks, "shear.bent-spacing").Capacity, "in"), 1e-9)
			}
		})
	}
}

// Legs spread evenly between the covers: (16 - 3 - 0.375)/(n - 1). A distance
// that is given goes before, and without cover or diameter none is known.
func TestStrengthsCountLegs(t *testing.T) {
	for _, k := range []struct {
		name string
		edit func(s *beam.StirrupSteel)
		want float64 // in.; zero: not judged
	}{
		{"given", func(s *beam.StirrupSteel) { s.Legs = 4 }, 12.6},
		{"four legs", func(s *beam.StirrupSteel) { s.Legs, s.Across = 4, units.Length{} }, 12.625 / 3},
		{"two legs", func(s *beam.StirrupSteel) { s.Legs, s.Across = 2, units.Length{} }, 12.625},
		{"legs not stated", func(s *beam.StirrupSteel) { s.Across = units.Length{} }, 0},
		{"no cover", func(s *beam.StirrupSteel) { s.Legs, s.Across, s.Cover = 2, units.Length{}, units.Length{} }, 0},
		{"no diameter", func(s *beam.StirrupSteel) { s.Legs, s.Across, s.Diameter = 2, units.Length{}, units.Length{} }, 0},
	} {
		q := query()
		k.edit(q.Stirrups)
		c := checkOf(t, strengthsOf(t, ACI31819(), q).Checks, "shear.spacing-across")
		if k.want == 0 {
			require.Equal(t, beam.NotJudged, c.Outcome, k.name)
			continue
		}
		require.InEpsilon(t, k.want, valueIn(t, c.Demand, "in"), 1e-9, k.name)
		require.Equal(t, beam.Pass, c.Outcome, k.name)
	}
}

// Axial force in Vc, by edition and sign: Ag = 416 in2, √4500 = 67.082 psi, bw d
// = 376 in2. What was decided is noted.
func TestStrengthsUnderAxialForce(t *testing.T) {
	const root, bd = 67.08203932499369, 16 * 23.5
	for _, k := range []struct {
		code  Code
		axial float64 // kip
		want  float64 // lb
	}{
		{ACI31819(), 100, (2*root + 100000.0/(6*416)) * bd},
		{ACI31819(), -100, (2*root - 100000.0/(6*416)) * bd},
		{ACI31814(), 100, 2 * (1 + 100000.0/(2000*416)) * root * bd},
		{ACI31814(), -100, 2 * (1 - 100000.0/(500*416)) * root * bd},
	} {
		q := query()
		q.Demand.Axial, q.Demand.Moment = units.Kip.Of(k.axial), units.KipFoot.Of(50)
		s := strengthsOf(t, k.code, q)
		require.InEpsilon(t, k.want, s.Shear.Concrete.In(units.PoundForce), 1e-9)
	}
	q := query()
	q.Demand = beam.Demand{Shear: units.Kip.Of(10), Axial: units.Kip.Of(-120)}
	q.Layers[0].Area = in2(8)
	q.Demand.Axial = units.PoundForce.Of(-2 * root * 6 * 416 * 1.001)
	w := us19.queryWeb(&q, &beam.FlexureStrength{EffectiveDepth: in(23.5), TensionSteel: in2(3.16)})
	v := w.at(&us19, us19.queryForces(&q, &w))
	require.True(t, contains(us19.shearStrength(&q, &w, &v).Notes, "axial tension leaves no concrete shear strength"))
}

// Exemptions, joists, λ and caps are named in the notes.
func TestStrengthsNoteWhatDecidedShear(t *testing.T) {
	for _, k := range []struct {
		name string
		code Code
		edit func(q *beam.SectionQuery)
		says string // none: no such note
		not  string
	}{
		{"plain", ACI31819(), func(q *beam.SectionQuery) {}, "", "exempt"},
		{"fibres", ACI31819(), func(q *beam.SectionQuery) { q.Concrete.Fibres, q.Section.Depth = true, in(24) }, "exempt: steel-fibre normalweight concrete of at most 6000 psi, no deeper than 24 in (Table 9.6.3.1)", ""},
		{"shallow", ACI31814(), func(q *beam.SectionQuery) {
			q.Section.Depth = in(10)
			q.Layers = []beam.SteelLayer{{Area: in2(1), Depth: in(7.5), Yield: psi(60000)}}
		}, "exempt: the beam is no deeper than 10 in", ""},
		{"joist", ACI31819(), func(q *beam.SectionQuery) {
			q.Section = beam.Section{Shape: beam.Tee, Width: in(8), Depth: in(26), FlangeThickness: in(4), FlangeWidth: in(30), Joist: true}
		}, "Vc holds the 1.1 of joists (9.8.1.5)", "breaks a limit"},
		{"no joist", ACI31819(), func(q *beam.SectionQuery) {
			q.Section = beam.Section{Shape: beam.Tee, Width: in(6), Depth: in(26), FlangeThickness: in(4), FlangeWidth: in(30), Joist: true}
		}, "the rib breaks a limit of 9.8.1 and is no joist (9.8.1.8)", "1.1"},
		{"blend", ACI31814(), func(q *beam.SectionQuery) {
			q.Concrete.Kind, q.Concrete.Normal, q.Concrete.Density = beam.FineBlend, 0.4, units.PoundPerCubicFoot.Of(110)
		}, "λ = 0.79 by the composition of the aggregate (Table 19.2.4.2)", ""},
		{"strong stirrups", ACI31819(), func(q *beam.SectionQuery) { q.Stirrups.Yield = psi(80000) }, "the stirrups count with 60000 psi", ""},
		{"few stirrups", ACI31819(), func(q *beam.SectionQuery) { q.Stirrups.Area = in2(0.1) }, "fewer or wider than least reinforcement", ""},
		{"strong concrete", ACI31819(), func(q *beam.SectionQuery) { q.Concrete.Strength, q.Stirrups = psi(11000), nil }, "√f'c is capped", "fewer or wider"},
	} {
		t.Run(k.name, func(t *testing.T) {
			q := query()
			q.Demand.Moment = units.KipFoot.Of(20)
			k.edit(&q)
			s := strengthsOf(t, k.code, q)
			if k.says != "" {
				require.True(t, contains(s.Shear.Notes, k.says), "%v", s.Shear.Notes)
			}
			if k.not != "" {
				require.False(t, contains(s.Shear.Notes, k.not), "%v", s.Shear.Notes)
			}
		})
	}
}

// Steel across the web that makes no sense is named by its path.
func TestStrengthsRefuseSlopesThatAreNone(t *testing.T) {
	sound := beam.BentSteel{Area: in2(1), Yield: psi(60000), Angle: 45}
	for path, edit := range map[string]func(q *beam.SectionQuery){
		"/stirrups/legs":  func(q *beam.SectionQuery) { q.Stirrups.Legs = 1 },
		"/stirrups/angle": func(q *beam.SectionQuery) { q.Stirrups.Angle = 14.9 },
		"/bent/angle":     func(q *beam.SectionQuery) { b := sound; b.Angle = 0; q.Bent = &b },
		"/bent/area":      func(q *beam.SectionQuery) { b := sound; b.Area = units.Area{}; q.Bent = &b },
		"/bent/yield":     func(q *beam.SectionQuery) { b := sound; b.Yield = units.Stress{}; q.Bent = &b },
		"/bent/spacing":   func(q *beam.SectionQuery) { b := sound; b.Spacing = mm(0.5); q.Bent = &b },
	} {
		q := query()
		edit(&q)
		_, err := ACI31819().Strengths(q)
		var input *beam.InputError
		require.True(t, errors.As(err, &input), path)
		require.Len(t, input.Faults, 1, path)
		require.Equal(t, path, input.Faults[0].Path)
		require.NotEmpty(t, input.Faults[0].Allowed)
	}
	for _, edit := range []func(q *beam.SectionQuery){
		func(q *beam.SectionQuery) { q.Stirrups.Legs = 20 },
		func(q *beam.SectionQuery) { q.Stirrups.Legs = 2 },
		func(q *beam.SectionQuery) { q.Stirrups.Angle = 15 },
		func(q *beam.SectionQuery) { b := sound; b.Angle = 15; q.Bent = &b },
		func(q *beam.SectionQuery) { b := sound; b.Angle = 90; q.Bent = &b },
	} {
		q := query()
		edit(&q)
		strengthsOf(t, ACI31819(), q)
	}
	for path, edit := range map[string]func(q *beam.SectionQuery){
		"/stirrups/legs":  func(q *beam.SectionQuery) { q.Stirrups.Legs = 21 },
		"/stirrups/angle": func(q *beam.SectionQuery) { q.Stirrups.Angle = 90.1 },
		"/bent/angle":     func(q *beam.SectionQuery) { b := sound; b.Angle = math.NaN(); q.Bent = &b },
	} {
		q := query()
		edit(&q)
		_, err := ACI31819().Strengths(q)
		require.ErrorContains(t, err, path)
	}
}
