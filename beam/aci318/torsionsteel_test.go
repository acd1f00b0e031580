package aci318

import (
	"math"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/beam"
	"soffit.example/beam/internal/vectors"
	"soffit.example/units"
)

// TestPublishedTorsion runs the check values of longitudinal and transverse
// steel.
func TestPublishedTorsion(t *testing.T) {
	vectors.Run(t, vectors.Load(t, "aci318/torsion.json"), func(t *testing.T, c *vectors.Case, code string) {
		require.Equal(t, "steel", c.Asks)
		e := codeOf(t, code).e
		s := beam.Section{Width: c.Length("b"), Depth: c.Length("h")}
		strength := torsionOf(t, e, s, &beam.Concrete{Strength: c.Stress("fc")}, units.Force{})
		cage := cageOf(t, e, s, &strength, c.Length("cover"), c.Length("dst"), c.Stress("fyt"), 0)
		leg := cage.legFor(e.momentIn(c.Moment("Tu")))
		pull, _ := cage.pullFor(leg)
		c.Meet(map[string]units.Amount{
			"Aoh": e.areaOf(cage.area).Amount(), "ph": e.lengthOf(cage.perimeter).Amount(),
			"Tth": e.momentOf(strength.threshold).Amount(), "Tcr": e.momentOf(strength.cracking).Amount(),
			"At_s": e.steelOf(leg).Amount(), "Al": e.areaOf(pull / e.torsionYield(c.Stress("fy"))).Amount(),
		})
	})
}

// cageOf encloses a section.
func cageOf(t testing.TB, e *edition, s beam.Section, strength *torsionStrength, cover, tie units.Length, fyt units.Stress, angle float64) torsionCage {
	t.Helper()
	g, faults := beam.GeometryOf(&s)
	require.Empty(t, faults)
	return e.torsionCage(&s, &g, strength, cover, tie, fyt, angle)
}

// ownSection is 16 by 28 in. with No. 4 stirrups under 1.5 in. of cover:
// x1 = 12.5, y1 = 24.5, Aoh = 306.25, ph = 74, Ao = 260.3125.
func ownSection() beam.Section {
	return beam.Section{Shape: beam.Rectangular, Width: in(16), Depth: in(28)}
}

func ownCage(t testing.TB, e *edition, fc, fyt, angle float64) (torsionStrength, torsionCage) {
	t.Helper()
	s := torsionOf(t, e, ownSection(), &beam.Concrete{Strength: psi(fc)}, units.Force{})
	return s, cageOf(t, e, ownSection(), &s, in(1.5), in(0.5), psi(fyt), angle)
}

// Bredt's formulas for a thin closed tube: a torque T turns into a shear flow
// q = T/(2A) round the area A inside the middle of the wall, and a stress q/t
// in a wall of thickness t. A truss whose diagonals stand at θ carries q with
// q tanθ in its hoops, for each length along the tube, and q cotθ along it, for
// each length round it. The formulas of 22.7.6.1 and 22.7.7.2 are these with
// Ao = 0.85 Aoh. (A. C. Ugural and S. K. Fenster, Advanced Mechanics of
// Materials and Applied Elasticity, thin-walled tubes, from memory.)
func TestTorsionAgainstAThinTube(t *testing.T) {
	rapid.Check(t, func(r *rapid.T) {
		e := rapid.SampledFrom(Editions()).Draw(r, "code").e
		s := beam.Section{
			Shape: beam.Rectangular,
			Width: in(rapid.Float64Range(10, 40).Draw(r, "b")), Depth: in(rapid.Float64Range(12, 60).Draw(r, "h")),
		}
		angle := rapid.Float64Range(30, 60).Draw(r, "θ")
		fyt := rapid.Float64Range(40000, 60000).Draw(r, "fyt")
		strength := torsionOf(t, e, s, &beam.Concrete{Strength: psi(4000)}, units.Force{})
		c := cageOf(t, e, s, &strength, in(1.5), in(0.5), psi(fyt), angle)
		torque := rapid.Float64Range(1e5, 1e8).Draw(r, "T")
		cot := 1 / math.Tan(angle*math.Pi/180)
		q := torque / (2 * 0.85 * (c.x1 * c.y1))
		leg := c.legFor(0.75 * torque)
		require.InEpsilon(t, q, leg*c.fyt*cot, 1e-9, "hoops")
		pull, _ := c.pullFor(leg)
		require.InEpsilon(t, q*cot*2*(c.x1+c.y1), pull, 1e-9, "along")
		wall := 0.5 * c.area / c.perimeter
		require.InEpsilon(t, q/wall, c.wallStress(torque, wall), 1e-9, "stress in a thin wall")
		thick := c.area / c.perimeter
		require.False(t, c.thin(thick))
		require.InEpsilon(t, q/thick, c.wallStress(torque, thick), 1e-9, "the two expressions meet at t = Aoh/ph")
		require.InEpsilon(t, q/thick, c.wallStress(torque, 2*thick), 1e-9, "no thicker wall counts")
	})
}

// 22.7.2.1: √f'c is at most 100 psi in threshold and cracking torsion. That at
// least Av,min stands lifts the cap for Vc alone (22.5.3.2).
func TestTrap14RootStaysCappedInTorsion(t *testing.T) {
	r := twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) { b.Concrete.Strength = psi(14400) })
	c := find1(t, r, "torsion.threshold")
	require.Equal(t, beam.NotApplicable, c.Outcome)
	want := 0.75 * 100 * 448.0 * 448 / 88 // lb-in
	require.InEpsilon(t, want, valueIn(t, c.Capacity, "lb-in"), 1e-12)
	require.Greater(t, 0.75*120*448.0*448/88, valueIn(t, c.Capacity, "lb-in"))
	v := find1(t, r, "torsion.section")
	for _, s := range v.Steps {
		if s.Symbol == "r" {
			require.InEpsilon(t, 120, valueIn(t, s.Value, "psi"), 1e-12, "Vc has all of it")
		}
	}
	// The same in SI, at 8.3 MPa.
	s := torsionOf(t, &si19, beam.Section{Width: units.Millimetre.Of(400), Depth: units.Millimetre.Of(700)}, &beam.Concrete{Strength: units.Megapascal.Of(90)}, units.Force{})
	require.InEpsilon(t, 0.083*8.3*280000*280000/2200, s.threshold, 1e-12)
	require.True(t, s.rootCapped)
}

// Table 20.2.2.4: no more than 60 ksi counts in torsion, of stirrups and of
// longitudinal bars.
func TestTrap15NoMoreThanGrade60InTorsion(t *testing.T) {
	_, soft := ownCage(t, &us19, 4000, 60000, 0)
	_, hard := ownCage(t, &us19, 4000, 80000, 0)
	require.Equal(t, soft.legFor(1e6), hard.legFor(1e6))
	require.True(t, hard.fytCapped)
	require.False(t, soft.fytCapped)
	require.InEpsilon(t, 1e6/(2*0.75*260.3125*60000), hard.legFor(1e6), 1e-12)
	require.Less(t, 1e6/(2*0.75*260.3125*80000), hard.legFor(1e6)*0.99, "what 80 ksi would give")
	require.Equal(t, 60000.0, us19.torsionYield(psi(100000)))
	require.Equal(t, 420.0, si14.torsionYield(units.Megapascal.Of(550)))
	require.Equal(t, 40000.0, us14.torsionYield(psi(40000)))

	// 75 ksi bars along the beam: At/s ph fyt over 60, not over 75 ksi.
	r := twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) { b.Reinforcement.Yield = psi(75000) })
	c := find1(t, r, "torsion.longitudinal.side")
	require.InEpsilon(t, ownLong(60000)*24.5*2/3/74, valueIn(t, c.Demand, "in2"), 1e-9)
}

// ownLong is Al of 45 kip-ft in the section of ownCage, for fyt = 60 ksi.
func ownLong(fy float64) float64 {
	return 45 * 12000 / (2 * 0.75 * 260.3125 * 60000) * 74 * 60000 / fy
}

// The section limit is judged where torsion acts, and there it counts more than
// that of shear alone; and its 8√f'c has no λ. Own calculation.
func TestTrap17SectionLimitWithTorsion(t *testing.T) {
	const d = 25.5 // 28 - 1.5 - 0.5 - 0.5
	for name, lambda := range map[string]float64{"normalweight": 1, "sand-lightweight": 0.85} {
		r := twisted(t, ACI31814(), func(b *beam.Brief, l *beam.Layout) {
			b.Demands[0].Torque = units.KipFoot.Of(100)
			if lambda < 1 {
				b.Concrete.Kind, b.Concrete.Density = beam.SandLightweight, units.PoundPerCubicFoot.Of(110)
			}
		})
		c := find1(t, r, "torsion.section")
		shear, torque := 30000/(16*d), 100*12000*74/(1.7*306.25*306.25)
		require.InEpsilon(t, math.Sqrt(shear*shear+torque*torque), valueIn(t, c.Demand, "psi"), 1e-12, name)
		require.InEpsilon(t, 0.75*(2*lambda+8)*math.Sqrt(4000), valueIn(t, c.Capacity, "psi"), 1e-12, name)
		require.Equal(t, beam.Fail, c.Outcome, name)
		require.Equal(t, beam.Pass, find1(t, r, "shear.section-limit").Outcome, "shear alone would pass")
		require.Greater(t, valueIn(t, c.Demand, "psi"), 0.75*(2+8)*math.Sqrt(4000)*1.01)
	}
}

// 9.5.4.3 and 22.7.6.1: At is one leg, and the outer ones alone resist torsion,
// while shear is shared by all; the least steel is that of Av + 2At.
func TestTrap19OuterLegs(t *testing.T) {
	const d = 25.5
	at := 45 * 12000 / (2 * 0.75 * 260.3125 * 60000)
	vs := 60000/0.75 - 2*math.Sqrt(4000)*16*d
	av := vs / (60000 * d)
	for _, legs := range []int{2, 4} {
		r := twisted(t, ACI31814(), func(b *beam.Brief, l *beam.Layout) {
			b.Demands[0].Shear = units.Kip.Of(60)
			l.Transverse[0].Legs = legs
		})
		c := find1(t, r, "torsion.transverse")
		require.InEpsilon(t, av/float64(legs)+at, valueIn(t, c.Demand, "in2/in"), 1e-9, legs)
		require.InEpsilon(t, 0.2/6, valueIn(t, c.Capacity, "in2/in"), 1e-12, "one leg: inner legs do not help")
		trapped := []float64{av/2 + at/2, av + at, (av + 2*at) / float64(legs+1)}
		for _, v := range trapped {
			require.Greater(t, math.Abs(v/valueIn(t, c.Demand, "in2/in")-1), 0.02)
		}
		least := find1(t, r, "torsion.minimum-stirrups")
		require.InEpsilon(t, float64(legs)*0.2/6, valueIn(t, least.Capacity, "in2/in"), 1e-12, "all legs: Av + 2At")
		require.InEpsilon(t, 50*16/60000.0, valueIn(t, least.Demand, "in2/in"), 1e-12)
	}
}

// Aoh goes to the centreline of the stirrup, Ao is 0.85 of it, and Acp is not
// that of the effective flange: 9.2.4.4 counts min(hw, 4hf) on each side.
func TestTrap20AreasOfTorsion(t *testing.T) {
	_, c := ownCage(t, &us19, 4000, 60000, 0)
	require.InEpsilon(t, 306.25, c.area, 1e-12)
	require.InEpsilon(t, 74.0, c.perimeter, 1e-12)
	require.InEpsilon(t, 0.85*306.25, c.flow, 1e-12)
	require.NotEqual(t, 13.0*25, c.area, "to the outside of the stirrup")
	require.NotEqual(t, 12.0*24, c.area, "to the inside")

	tee := beam.Section{Shape: beam.Tee, Width: in(14), Depth: in(24), FlangeThickness: in(4), FlangeWidth: in(78)}
	s := torsionOf(t, &us19, tee, &beam.Concrete{Strength: psi(4000)}, units.Force{})
	require.True(t, s.counted)
	// 4hf = 16 in. of the 32 in. on each side, less than hw = 20 in.
	require.InEpsilon(t, 14*24+2*16*4.0, s.enclosed, 1e-12)
	require.InEpsilon(t, 2*(14+24+32.0), s.perimeter, 1e-12)
	require.NotEqual(t, 14*24+64*4.0, s.enclosed)
}

// 9.2.4.4 from all of its sides: 4hf, the web's projection, the flange itself,
// and flanges left out where they lessen Acp²/pcp. Own calculations.
func TestFlangesInTorsion(t *testing.T) {
	for _, tc := range []struct {
		name    string
		s       beam.Section
		counted bool
		acp     float64
		pcp     float64
	}{
		{"four thicknesses", beam.Section{Shape: beam.Tee, Width: in(12), Depth: in(30), FlangeThickness: in(5), FlangeWidth: in(100)}, true, 12*30 + 40*5, 2 * (12 + 30 + 40)},
		{"projection of the web", beam.Section{Shape: beam.Tee, Width: in(12), Depth: in(20), FlangeThickness: in(6), FlangeWidth: in(100)}, true, 12*20 + 28*6, 2 * (12 + 20 + 28)},
		{"the flange itself", beam.Section{Shape: beam.Tee, Width: in(12), Depth: in(30), FlangeThickness: in(5), FlangeWidth: in(32)}, true, 12*30 + 20*5, 2 * (12 + 30 + 20)},
		{"one side", beam.Section{Shape: beam.Ell, Width: in(12), Depth: in(30), FlangeThickness: in(5), FlangeWidth: in(100)}, true, 12*30 + 20*5, 2 * (12 + 30 + 20)},
		{"ledges", beam.Section{Shape: beam.InvertedTee, Width: in(12), Depth: in(30), FlangeThickness: in(8), FlangeWidth: in(24)}, true, 12*30 + 12*8, 2 * (12 + 30 + 12)},
		// 360²/84 = 1542.9 without, (360 + 32)²/116 = 1324.7 with.
		{"thin flange left out", beam.Section{Shape: beam.Tee, Width: in(12), Depth: in(30), FlangeThickness: in(2), FlangeWidth: in(100)}, false, 12 * 30, 2 * (12 + 30)},
		{"flange of no overhang", beam.Section{Shape: beam.Tee, Width: in(12), Depth: in(30), FlangeThickness: in(5), FlangeWidth: in(12)}, false, 12 * 30, 2 * (12 + 30)},
	} {
		t.Run(tc.name, func(t *testing.T) {
			s := torsionOf(t, &us19, tc.s, &beam.Concrete{Strength: psi(4000)}, units.Force{})
			require.Equal(t, tc.counted, s.counted)
			require.InEpsilon(t, tc.acp, s.enclosed, 1e-12)
			require.InEpsilon(t, tc.pcp, s.perimeter, 1e-12)
		})
	}
	// A slab reaches half way to the next web, whatever of it works in bending.
	slab := beam.Section{
		Shape: beam.Ell, Width: in(12), Depth: in(30), FlangeThickness: in(5), FlangeWidth: in(20),
		OverhangRight: in(8), Slab: beam.Slab{ClearRight: in(30)},
	}
	s := torsionOf(t, &us19, slab, &beam.Concrete{Strength: psi(4000)}, units.Force{})
	require.InEpsilon(t, 12*30+15*5.0, s.enclosed, 1e-12)
}

// box is a hollow section of 40 by 40 in. with walls all round.
func box(wall float64) beam.Section {
	square := func(a, b float64) []beam.Point {
		return []beam.Point{{X: in(a), Y: in(a)}, {X: in(b), Y: in(a)}, {X: in(b), Y: in(b)}, {X: in(a), Y: in(b)}}
	}
	return beam.Section{Shape: beam.Polygon, Outline: square(0, 40), Voids: [][]beam.Point{square(wall, 40-wall)}}
}

// Of a hollow section Ag stands for Acp in the threshold, not in the cracking
// torsion; a hollow of no more than 5 % changes neither. Own calculations.
func TestHollowThreshold(t *testing.T) {
	c := beam.Concrete{Strength: psi(4900)}
	s := torsionOf(t, &us19, box(8), &c, units.Force{})
	ag := 1600 - 24*24.0
	require.True(t, s.hollow)
	require.InEpsilon(t, 70*ag*ag/160, s.threshold, 1e-9)
	require.InEpsilon(t, 4*70*1600.0*1600/160, s.cracking, 1e-9)

	// Nu/(4 Ag λ√f'c) with the area of the concrete.
	s = torsionOf(t, &us19, box(8), &c, units.Kip.Of(100))
	require.InEpsilon(t, 70*ag*ag/160*math.Sqrt(1+100000/(4*ag*70)), s.threshold, 1e-9)

	s = torsionOf(t, &us19, box(15.6), &c, units.Force{}) // 8.8² of 1600: 4.8 %
	require.False(t, s.hollow)
	require.InEpsilon(t, 70*1600.0*1600/160, s.threshold, 1e-9)
	s = torsionOf(t, &us19, box(15.4), &c, units.Force{}) // 9.2² of 1600: 5.3 %
	require.True(t, s.hollow)
}

// 22.7.7.1(b) adds the stresses of a hollow section, and takes a wall thinner
// than Aoh/ph by its thickness. Own calculation: 40 in. box, No. 4 stirrups,
// 1.5 in. of cover: x1 = y1 = 36.5, Aoh = 1332.25, ph = 146, Aoh/ph = 9.125.
func TestHollowAdequacy(t *testing.T) {
	web := webSteel{bare: webShear{web: 500, d: 36}, fyt: 60000}
	shear := sectionShear{shear: 50000, limit: 500 * 400}
	for _, tc := range []struct {
		wall, torque float64
	}{{6, 6e6 / (1.7 * 1332.25 * 6)}, {9.125, 6e6 * 146 / (1.7 * 1332.25 * 1332.25)}, {12, 6e6 * 146 / (1.7 * 1332.25 * 1332.25)}} {
		s := torsionOf(t, &us19, box(tc.wall), &beam.Concrete{Strength: psi(4000)}, units.Force{})
		c := cageOf(t, &us19, box(tc.wall), &s, in(1.5), in(0.5), psi(60000), 0)
		v := c.at(sectionTorque{acting: 6e6, used: 6e6}, &web, &shear, 2, 0)
		require.InEpsilon(t, 100+tc.torque, v.stress, 1e-9, "%g", tc.wall)
		require.Greater(t, math.Abs(math.Hypot(100, tc.torque)/v.stress-1), 0.05, "no root of squares")
		require.InEpsilon(t, 400.0, v.limit, 1e-12)
		require.InEpsilon(t, tc.wall-1.75, c.wall, 1e-9)
		require.InEpsilon(t, 0.5*9.125, c.wallNeeded, 1e-9)
	}
	// A thin wall above or below bears the torque alone, and may govern.
	thin := box(12)
	for i := range thin.Voids[0] {
		if p := &thin.Voids[0][i]; p.Y == in(28) {
			p.Y = in(37)
		}
	}
	s := torsionOf(t, &us19, thin, &beam.Concrete{Strength: psi(4000)}, units.Force{})
	c := cageOf(t, &us19, thin, &s, in(1.5), in(0.5), psi(60000), 0)
	v := c.at(sectionTorque{acting: 6e6, used: 6e6}, &web, &shear, 2, 0)
	require.True(t, v.flatGoverns)
	require.InEpsilon(t, 6e6/(1.7*1332.25*3), v.stress, 1e-9)
}

// A hollow that leaves no wall, or no room for a stirrup, is no strength.
func TestNoWallNoStrength(t *testing.T) {
	shear, web := sectionShear{shear: 1, limit: 1e9}, webSteel{bare: webShear{web: 500, d: 36}, fyt: 60000}
	q := sectionTorque{acting: 1, used: 1}
	s, c := ownCage(t, &us19, 4000, 60000, 0)
	require.Empty(t, c.at(q, &web, &shear, 2, 0).broken)
	require.Equal(t, noteNoDepth, c.at(q, &webSteel{}, &shear, 2, 0).broken)
	c = cageOf(t, &us19, ownSection(), &s, in(8), in(0.5), psi(60000), 0)
	require.Equal(t, noteNoCage, c.at(q, &web, &shear, 2, 0).broken)

	// A tee with its hollow in the flange, outside the strip of the web.
	wide := beam.Section{Shape: beam.Polygon, Outline: []beam.Point{
		{X: in(0), Y: in(30)}, {X: in(0), Y: in(18)}, {X: in(20), Y: in(18)}, {X: in(20), Y: in(0)}, {X: in(34), Y: in(0)}, {X: in(34), Y: in(30)},
	}, Voids: [][]beam.Point{{{X: in(4), Y: in(21)}, {X: in(24), Y: in(21)}, {X: in(24), Y: in(27)}, {X: in(4), Y: in(27)}}}}
	s = torsionOf(t, &us19, wide, &beam.Concrete{Strength: psi(4000)}, units.Force{})
	c = cageOf(t, &us19, wide, &s, in(1.5), in(0.5), psi(60000), 0)
	require.Equal(t, noteNoWall, c.at(q, &web, &shear, 2, 0).broken)
	require.Negative(t, c.wall)
}

// Compatibility torsion may be cut to φTcr, and no further; what lies between
// φTth and φTcr is designed for in full; equilibrium torsion is never cut.
func TestTrap21CompatibilityTorsion(t *testing.T) {
	s, _ := ownCage(t, &us19, 4000, 60000, 0)
	crack := 0.75 * 4 * math.Sqrt(4000) * 448 * 448 / 88
	action := func(all, compatible float64) *beam.Action {
		return &beam.Action{Torque: units.PoundInch.Of(all), Compatible: units.PoundInch.Of(compatible)}
	}
	for _, tc := range []struct {
		name            string
		all, compatible float64
		used, shed      float64
	}{
		{"cut to cracking", 2 * crack, 2 * crack, crack, crack},
		{"either sense", -2 * crack, -2 * crack, crack, crack},
		{"just at cracking", crack, crack, crack, 0},
		{"below cracking in full", 0.6 * crack, 0.6 * crack, 0.6 * crack, 0},
		{"equilibrium in full", 2 * crack, 0, 2 * crack, 0},
		{"equilibrium part stays", 3 * crack, crack, 2 * crack, crack},
		{"small equilibrium part", 3 * crack, 2.5 * crack, crack, 2 * crack},
		{"against each other", crack, -2 * crack, 3 * crack, 0},
		{"against each other, the greater shed", -crack * 1.5, -2 * crack, crack, 0.5 * crack},
	} {
		q := s.torque(&us19, action(tc.all, tc.compatible))
		require.InEpsilon(t, tc.used, q.used, 1e-9, tc.name)
		require.InDelta(t, tc.shed, q.shed, 1e-6, tc.name)
		require.False(t, q.neglected, tc.name)
	}

	r := twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) {
		b.Demands[0].Torque, b.Demands[0].Path = units.KipFoot.Of(80), beam.CompatibilityTorque
	})
	c := find1(t, r, "torsion.section")
	require.Equal(t, noteShed, find1(t, r, "torsion.transverse").Reason)
	var used float64
	for _, s := range c.Steps {
		if s.Symbol == "Tu" {
			used = valueIn(t, s.Value, "lb-in")
		}
	}
	require.InEpsilon(t, crack, used, 1e-9)
	require.NotEqual(t, 0.75*s.threshold, used)
	found := false
	for _, a := range r.Assumptions {
		if a.ID == "torsion.redistribution" {
			found = true
			require.True(t, a.Open, "the neighbours are the engineer's to see to")
			require.Contains(t, a.Found, beam.Short(units.US, units.PoundInch.Of(80*12000-crack).Amount()))
		}
	}
	require.True(t, found)
	require.Contains(t, strings.Join(r.Cautions, "\n"), "sheds by 22.7.3.2")
}

// 9.6.4.3: the lesser of both expressions, that is At/s no lower than 25bw/fyt
// in the first, and never less than nothing. Own calculations.
func TestTrap22LeastLongitudinalSteelIsTheLesser(t *testing.T) {
	_, c := ownCage(t, &us19, 4000, 60000, 0)
	pull := 5 * math.Sqrt(4000) * 448
	floor := 25 * 16 / 60000.0
	for _, tc := range []struct{ leg, want float64 }{
		{0.5 * floor, pull - floor*74*60000},
		{floor, pull - floor*74*60000},
		{2 * floor, pull - 2*floor*74*60000},
		{0.04, 0}, // 141,669 - 177,600 lb
	} {
		require.InDelta(t, tc.want, c.leastPull(tc.leg), 1e-6, "%g", tc.leg)
		greater := pull - min(tc.leg, floor)*74*60000
		if tc.leg != floor {
			require.Greater(t, greater, c.leastPull(tc.leg)+1, "the greater of both")
		}
	}
	m := cageOf(t, &si19, beam.Section{Width: units.Millimetre.Of(400), Depth: units.Millimetre.Of(700)},
		&torsionStrength{phi: 0.75, strength: 25, torsionShape: torsionShape{enclosed: 280000}}, units.Millimetre.Of(40), units.Millimetre.Of(12), units.Megapascal.Of(420), 0)
	require.InEpsilon(t, 0.42*5*280000-0.175*400/420*m.perimeter*420, m.leastPull(0), 1e-12)
}
