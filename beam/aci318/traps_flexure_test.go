package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/mechanics"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// Each of these tests lands where a well-known slip would show: it works out the
// slipped value too, and asserts that it is another one.

func strengthOf(t testing.TB, c Code, s mechanics.Section, fc units.Stress, r beam.Readings) beam.FlexureStrength {
	t.Helper()
	f, err := c.e.flexureStrength(s, fc, beam.Positive, &r)
	require.NoError(t, err)
	return f
}

// φ and the strain limit go by the extreme layer at dt, strength by the centroid
// at d. 14 in. wide, 4000 psi, Grade 60, 3 in2 at 21 and at 19 in: c =
// 360/(0.85 × 4 × 14)/0.85 = 8.898 in. Own calculation from 22.2.
func TestTrap01DepthOfTheExtremeLayer(t *testing.T) {
	e := ACI31814().e
	s := e.testSection(in(14), in(24), psi(60000), mechanics.Layer{Depth: in(21), Area: in2(3)}, mechanics.Layer{Depth: in(19), Area: in2(3)})
	f := strengthOf(t, ACI31814(), s, psi(4000), beam.Readings{})
	a := 360 / (0.85 * 4 * 14)
	c := a / 0.85
	require.InEpsilon(t, 21, f.ExtremeDepth.In(units.Inch), 1e-12)
	require.InEpsilon(t, 20, f.EffectiveDepth.In(units.Inch), 1e-12)
	require.InEpsilon(t, 0.003*(21-c)/c, f.ExtremeStrain, 1e-9)
	slipped := 0.003 * (20 - c) / c
	require.Greater(t, f.ExtremeStrain-slipped, 3e-4, "a strain at d")
	require.InEpsilon(t, 360*(20-a/2), f.Nominal.In(units.KipInch), 1e-9)
	require.NotEqual(t, 360*(21-a/2), f.Nominal.In(units.KipInch), "moments about dt")
}

// Compression steel counts with the stress that it has, less the concrete that it
// displaces where it lies in the block, and only there.
func TestTrap02CompressionSteel(t *testing.T) {
	e := ACI31819().e
	// 12 in. wide, 3 in2 at 20 in, 1 in2 at 2.5 in. Without it a = 4.41 in: it lies
	// in the block and does not yield.
	at := func(top float64, r beam.Readings) beam.FlexureStrength {
		s := e.testSection(in(12), in(22.5), psi(60000), mechanics.Layer{Depth: in(20), Area: in2(3)}, mechanics.Layer{Depth: in(top), Area: in2(1)})
		return strengthOf(t, ACI31819(), s, psi(4000), r)
	}
	k := 0.85 * 4 * 0.85 * 12
	solve := func(p, q float64) float64 { return (-p + math.Sqrt(p*p+4*k*q)) / (2 * k) }
	f := at(2.5, beam.Readings{})
	c := solve(1*(87-3.4)-180, 87*2.5)
	require.InEpsilon(t, c, f.NeutralAxis.In(units.Inch), 1e-9)
	require.Less(t, 87*(c-2.5)/c, 60.0, "it does not yield")
	require.InEpsilon(t, -87*(c-2.5)/c, f.Layers[1].Stress.In(units.KSI), 1e-9)
	require.NotEqual(t, -60.0, f.Layers[1].Stress.In(units.KSI))
	require.InEpsilon(t, 87*(c-2.5)/c-3.4, -f.Layers[1].Force.In(units.Kip), 1e-9)
	kept := at(2.5, beam.Readings{IgnoreDisplaced: true})
	require.InEpsilon(t, solve(87-180, 87*2.5), kept.NeutralAxis.In(units.Inch), 1e-9)
	require.Greater(t, f.NeutralAxis.In(units.Inch)-kept.NeutralAxis.In(units.Inch), 0.05, "the displaced concrete counts")

	// At 4.7 in. it lies between the block and the neutral axis: pressed, and
	// displacing nothing.
	f = at(4.7, beam.Readings{})
	c = solve(87-180, 87*4.7)
	require.Less(t, 0.85*c, 4.7)
	require.Less(t, 4.7, c)
	require.InEpsilon(t, c, f.NeutralAxis.In(units.Inch), 1e-9)
	slipped := solve(87-3.4-180, 87*4.7)
	require.Greater(t, math.Abs(slipped-c), 0.05)
}

// A strain of 0.0045 passes in 318-14 with φ of about 0.86 and fails in 318-19.
// Grade 80 needs fy/Es + 0.003 = 0.0057586 there: neither 0.005 nor an εty of
// 0.002, which is for Grade 60 alone.
func TestTrap03StrainLimitOf31819(t *testing.T) {
	for _, tc := range []struct {
		code  Code
		yield float64
		least float64
		pass  bool
	}{
		{ACI31814(), 60000, 0.004, true}, {ACI31819(), 60000, 60.0/29000 + 0.003, false},
		{ACI31814(), 80000, 0.004, true}, {ACI31819(), 80000, 80.0/29000 + 0.003, false},
	} {
		e := tc.code.e
		c := 20 * 0.003 / 0.0075 // a strain of 0.0045 at 20 in
		as := 0.85 * 4000 * 12 * 0.85 * c / tc.yield
		s := e.testSection(in(12), in(22.5), psi(tc.yield), mechanics.Layer{Depth: in(20), Area: in2(as)})
		f := strengthOf(t, tc.code, s, psi(4000), beam.Readings{RoundedYield: true})
		require.InEpsilon(t, 0.0045, f.ExtremeStrain, 1e-9)
		if tc.yield == 60000 && tc.code.e.year == 2019 {
			require.InEpsilon(t, 0.005, f.LeastStrain, 1e-12, "the permitted rounding")
			f = strengthOf(t, tc.code, s, psi(4000), beam.Readings{})
		}
		require.InEpsilon(t, tc.least, f.LeastStrain, 1e-12)
		require.Equal(t, tc.pass, f.LeastStrain <= f.ExtremeStrain)
		if tc.yield == 60000 && tc.code.e.year == 2014 {
			require.InDelta(t, 0.65+0.25*(0.0045-0.002)/0.003, f.Phi, 1e-9)
		}
		if tc.yield == 80000 {
			require.InEpsilon(t, 80.0/29000, f.YieldStrain, 1e-12)
			require.Greater(t, f.YieldStrain, 0.0025, "not 0.002")
			require.InEpsilon(t, 80.0/29000, f.YieldStrain, 1e-12)
		}
	}
}

// β1 in SI steps from 0.657 to 0.65 at 55 MPa: a line clamped at 0.65 would give
// 0.6571 there. Strains and φ go by c, not by a.
func TestTrap04BlockFactorSteps(t *testing.T) {
	for _, c := range []Code{ACI31814M(), ACI31819M()} {
		require.InEpsilon(t, 0.65, c.e.blockFactor(mpa(55)), 1e-15)
		require.InEpsilon(t, 0.85-0.05*26.9/7, c.e.blockFactor(mpa(54.9)), 1e-12)
		require.Less(t, c.e.blockFactor(mpa(55)), 0.85-0.05*27.0/7-5e-3, "a clamped line")
	}
	e := ACI31819().e
	s := e.testSection(in(12), in(22.5), psi(60000), mechanics.Layer{Depth: in(20), Area: in2(2)})
	f := strengthOf(t, ACI31819(), s, psi(4000), beam.Readings{})
	a := 120 / (0.85 * 4 * 12)
	require.InEpsilon(t, a/0.85, f.NeutralAxis.In(units.Inch), 1e-12)
	require.InEpsilon(t, 0.003*(20-a/0.85)/(a/0.85), f.ExtremeStrain, 1e-9)
	require.Greater(t, 0.003*(20-a)/a-f.ExtremeStrain, 1e-3, "a strain by a")
}

// An inner layer that does not reach its yield strain counts with the stress it
// has: 3 in2 at 22 in. and 2 in2 at 10 in, 12 in. wide. All yielding, c would be
// 8.651 in, where the inner layer strains 0.00047 only.
func TestTrap05InnerLayerBelowYield(t *testing.T) {
	e := ACI31814().e
	s := e.testSection(in(12), in(24), psi(60000), mechanics.Layer{Depth: in(22), Area: in2(3)}, mechanics.Layer{Depth: in(10), Area: in2(2)})
	f := strengthOf(t, ACI31814(), s, psi(4000), beam.Readings{})
	// 0.85 f'c b β1 c² + (2 × 87 - 180) c - 2 × 87 × 10 = 0
	k, p, q := 0.85*4*12*0.85, 2*87.0-180, 2*87*10.0
	c := (-p + math.Sqrt(p*p+4*k*q)) / (2 * k)
	require.InEpsilon(t, c, f.NeutralAxis.In(units.Inch), 1e-9)
	require.InEpsilon(t, 87*(10-c)/c, f.Layers[1].Stress.In(units.KSI), 1e-9)
	require.Less(t, f.Layers[1].Stress.In(units.KSI), 40.0)
	slipped := 300 / (0.85 * 4 * 12) / 0.85
	require.Greater(t, slipped-c, 0.5)
}

// 9.6.1.2: a cantilever tee with its flange in tension goes by min(bf, 2bw), an
// indeterminate beam by bw whichever face is in tension. d = 24 - 1.5 - 0.375 -
// 0.5 = 21.625 in, f'c = 4000 psi, Grade 60: 200/60000 × 21.625 × b.
func TestTrap06WidthOfLeastSteel(t *testing.T) {
	rows := []beam.Row{bottom(4, "#8"), top(4, "#8"), flangeRow(beam.Top, 2, "#8", 7)}
	least := func(c Code, b beam.Brief, id string) float64 {
		r, _ := check(t, c, b, rows)
		found := find1(t, r, id)
		requireEvaluable(t, found)
		return valueIn(t, found.Demand, "in2") / (200.0 / 60000 * 21.625)
	}
	for _, c := range []Code{ACI31814(), ACI31819()} {
		b := hoggingTee(20, 40)
		require.InEpsilon(t, 24, least(c, b, "flexure.minimum.negative"), 1e-9, "2bw")
		b.Section.FlangeWidth = in(20)
		require.InEpsilon(t, 20, least(c, b, "flexure.minimum.negative"), 1e-9, "bf")
		b.Section.FlangeWidth = in(40)
		b.Supports[1] = beam.Support{Kind: statics.Roller, Width: in(12)}
		require.InEpsilon(t, 12, least(c, b, "flexure.minimum.negative"), 1e-9, "propped: bw")
		require.InEpsilon(t, 12, least(c, b, "flexure.minimum.positive"), 1e-9, "the web in tension: bw")
		// Demands do not say: the stricter.
		d := demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(-150)}, beam.Demand{Name: "2", Moment: units.KipFoot.Of(150)})
		d.Section = b.Section
		require.InEpsilon(t, 24, least(c, d, "flexure.minimum.negative"), 1e-9)
		require.InEpsilon(t, 12, least(c, d, "flexure.minimum.positive"), 1e-9)
		// Ledges at the bottom, sagging: they are the flange in tension.
		d.Section.Shape = beam.InvertedTee
		r, _ := check(t, c, d, []beam.Row{bottom(4, "#8"), top(4, "#8")})
		require.InEpsilon(t, 24, valueIn(t, find1(t, r, "flexure.minimum.positive").Demand, "in2")/(200.0/60000*21.625), 1e-9)
	}
}

// The 4/3 of 9.6.1.3 goes on the steel required by analysis, not on As,min, and
// the beam needs the lesser. 14 by 24 in, d = 21.6875 in, As,min = 200/60000 × 14
// × 21.6875 = 1.0121 in2; Mu = 30 kip-ft needs a = d - √(d² - 2Mu/(0.9 × 0.85 × 4
// × 14)) = 0.39103 in, As = 0.31022 in2, 4/3 of it 0.41363 in2.
func TestTrap07FourThirds(t *testing.T) {
	d := 24 - 1.5 - 0.375 - 0.4375
	a := d - math.Sqrt(d*d-2*360/(0.9*0.85*4*14))
	required := 0.85 * 4 * 14 * a / 60
	rows := []beam.Row{bottom(2, "#7"), top(2, "#4")} // 1.20 in2
	for _, tc := range []struct {
		moment float64
		bar    string
	}{{30, "#4"}, {30, "#7"}} {
		rows[0].Bar = tc.bar
		r, _ := checkUS(t, ACI31819(), rows, nil, beam.Demand{Name: "1", Moment: units.KipFoot.Of(tc.moment)})
		c := find1(t, r, "flexure.minimum.positive")
		if tc.bar == "#7" {
			require.Equal(t, "9.6.1.2", c.Clause)
			require.InEpsilon(t, 200.0/60000*14*d, valueIn(t, c.Demand, "in2"), 1e-9)
			continue
		}
		depth := 24 - 1.5 - 0.375 - 0.25
		block := depth - math.Sqrt(depth*depth-2*360/(0.9*0.85*4*14))
		require.Equal(t, "9.6.1.3", c.Clause)
		require.InEpsilon(t, 4.0/3*0.85*4*14*block/60, valueIn(t, c.Demand, "in2"), 1e-9)
		require.Equal(t, beam.Fail, c.Outcome, "0.40 in2 are provided")
		requireEvaluable(t, c)
	}
	require.InDelta(t, 0.31022, required, 5e-5)
	require.Less(t, 4.0/3*required, 200.0/60000*14*d, "not 4/3 of As,min")
}

// 9.6.1.2 of 318-19 counts no more than 80 ksi: 3√f'c/fy and 200/fy with fy = 100
// ksi would ask for a fifth less.
func TestTrap08LeastSteelOfStrongBars(t *testing.T) {
	width := ACI31819().e.minimumWidth(in(12), in(12), true)
	m := ACI31819().e.minimumSteel(psi(4000), psi(100000), width, in(20))
	require.True(t, m.capped)
	require.InEpsilon(t, 200.0/80000*240, m.area, 1e-12)
	require.Greater(t, m.area, 200.0/100000*240*1.2)
	mm2 := ACI31819M().e.minimumSteel(mpa(28), mpa(690), ACI31819M().e.minimumWidth(mm(300), mm(300), true), mm(500))
	require.InEpsilon(t, 1.4/550*300*500, mm2.area, 1e-12)
	require.False(t, ACI31819().e.minimumSteel(psi(4000), psi(80000), width, in(20)).capped)
	require.InEpsilon(t, 200.0/75000*240, ACI31814().e.minimumSteel(psi(4000), psi(75000), width, in(20)).area, 1e-12)
}

// A corner bar stands at the tangent point of the stirrup's bend, not against its
// leg: 4 #8 in a No. 4 stirrup with 1.5 in. of cover need 2 (1.5 + 0.5 + 1.0) + 3 ×
// (1 + 1) = 12 in; at cover + dst + db/2 sideways 11 in. would seem to do.
func TestTrap27CornerBar(t *testing.T) {
	for width, want := range map[float64]beam.Outcome{12: beam.Pass, 11.9: beam.Fail, 11: beam.Fail} {
		b := demandBrief(beam.Demand{Name: "1", Moment: units.KipFoot.Of(100)})
		b.Section.Width = in(width)
		b.Concrete.Aggregate = in(0.5)
		p := problemOf(t, ACI31819(), b)
		tr := trialOf(t, p, "#4", []group{{4, "#8"}}, nil)
		c := only(t, ACI31819().e.appendGaps(nil, tr, beam.Bottom), "spacing.clear")
		require.Equal(t, want, c.Outcome, "%v in", width)
		require.InDelta(t, 3, tr.Bottom.Fit.Bars[0].X.In(units.Inch), 1e-9)
		require.Greater(t, tr.Bottom.Fit.Bars[0].X.In(units.Inch), 2.6, "not against the leg")
	}
}
