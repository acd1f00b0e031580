package aci318

import (
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// A judgement without working allocates nothing once its slice has grown.
func TestJudgingShearAllocatesNothing(t *testing.T) {
	for _, c := range Editions() {
		tr := shearTrial(t, c, func(b *beam.Brief) {
			b.Loads = append(b.Loads, beam.Load{Case: beam.Live, Shape: beam.PointLoad, Force: units.Kip.Of(5), At: units.Foot.Of(11)})
		})
		addZone(tr, 2, 10, 6, 96)
		addZone(tr, 2, 10, 168, 258)
		tr.Top.InCompression = true
		dst := c.e.judgeShearing(nil, tr)
		for name, judge := range map[string]func(){
			"shearing": func() { dst = c.e.judgeShearing(dst[:0], tr) },
			"fitting":  func() { dst = c.e.judgeFitting(dst[:0], tr) },
			"whole":    func() { dst = c.e.judgeWhole(dst[:0], tr) },
		} {
			require.Zero(t, testing.AllocsPerRun(20, judge), "%s, %s", c.e.id, name)
		}
	}
}

// The working of every check is right: each expression gives its value.
func TestWorkingOfShear(t *testing.T) {
	strong := func(b *beam.Brief) { b.Concrete.Strength = units.PSI.Of(12000) }
	light := func(b *beam.Brief) {
		b.Concrete.Kind, b.Concrete.Density = beam.SandLightweight, units.PoundPerCubicFoot.Of(110)
		b.Reinforcement.StirrupYield = units.KSI.Of(80)
	}
	detailed := func(b *beam.Brief) { b.Readings.ShearMethod = beam.DetailedShear }
	heavy := func(b *beam.Brief) {
		b.Loads[1].Intensity = units.KipPerFoot.Of(12)
	}
	shallow := func(b *beam.Brief) {
		b.Section.Depth, b.Spans[0] = units.Inch.Of(10), units.Foot.Of(14)
	}
	axial := func(n float64) func(*beam.Brief) {
		return func(b *beam.Brief) {
			*b = demandBrief(beam.Demand{Name: "A", Moment: units.KipFoot.Of(150), Shear: units.Kip.Of(30), Axial: units.Kip.Of(n)})
		}
	}
	for _, c := range Editions() {
		for name, edit := range map[string]func(*beam.Brief){
			"plain": nil, "strong": strong, "light": light, "detailed": detailed, "heavy": heavy, "shallow": shallow,
			"axial": axial(60), "pure": axial(0),
		} {
			for _, spacing := range []float64{0, 4, 10, 24} { // 0: none
				tr := shearTrial(t, c, edit)
				tr.Record = true
				tr.Top.InCompression = true
				if spacing > 0 {
					addZone(tr, 2, spacing, 6, 200)
				}
				bare := *tr
				bare.Record = false
				checks := c.e.judgeShearing(nil, tr)
				for i := range checks {
					if o := checks[i].Outcome; len(checks[i].Steps) > 0 || strings.HasPrefix(checks[i].ID, "shear.s") && o == beam.Fail {
						requireEvaluable(t, &checks[i])
					}
				}
				// The verdicts are those without working.
				for i, k := range c.e.judgeShearing(nil, &bare) {
					checks[i].Steps = nil
					require.Equal(t, k, checks[i], "%s %s", c.e.id, name)
				}
			}
		}
	}
}

// The same for every row of Vc, where demands do not reach it.
func TestWorkingOfEveryRow(t *testing.T) {
	us := shearCase{fc: 4000, lambda: 1, bw: 12, h: 20, d: 17.5, as: 2, fyt: 60000, vu: 20000, mu: 700000}
	seen := map[concreteRow]bool{}
	for _, e := range []*edition{&us14, &us19} {
		for _, nu := range []float64{0, 48000, 300000, -24000, -300000} {
			for _, as := range []float64{2, 9, 60} {
				for _, av := range []float64{0, 0.4} {
					for _, method := range []beam.ShearMethod{beam.SimplifiedShear, beam.DetailedShear} {
						for _, row := range []beam.ShearRow{beam.LargerRow, beam.RowA, beam.RowB} {
							for _, mu := range []float64{0, 100000, 700000} {
								for _, fc := range []float64{4000, 14400} {
									c := us
									c.nu, c.as, c.av, c.s, c.method, c.row, c.mu, c.fc = nu, as, av, 8, method, row, mu, fc
									w, s := c.evaluate(e)
									seen[s.concrete.row] = true
									require.NotEmpty(t, s.concrete.row.String())
									require.NotEmpty(t, s.concrete.row.clause())
									for _, steps := range [][]beam.Step{w.strengthSteps(e, &s, nil), w.limitSteps(e, &s), w.leastSteps(e, &s), w.spacingSteps(e, &s)} {
										requireEvaluable(t, &beam.Check{ID: e.id, Steps: steps})
									}
								}
							}
						}
					}
				}
			}
		}
	}
	require.Len(t, seen, int(rowNone), "every row was reached")
	require.Empty(t, concreteRow(0).String())
	require.Empty(t, concreteRow(0).clause())
}

func BenchmarkJudgeShearing(b *testing.B) {
	c := ACI31819()
	tr := shearTrial(b, c, nil)
	addZone(tr, 2, 10, 6, 96)
	addZone(tr, 2, 12, 96, 168)
	addZone(tr, 2, 10, 168, 258)
	dst := c.e.judgeShearing(nil, tr)
	b.ReportAllocs()
	for b.Loop() {
		dst = c.e.judgeShearing(dst[:0], tr)
	}
}

func BenchmarkSectionShear(b *testing.B) {
	c := shearCase{fc: 4500, lambda: 1, bw: 15, h: 26, d: 22.4, as: 3.16, av: 0.22, s: 9, fyt: 60000}
	w, _ := c.evaluate(&us19)
	f := shearForces{shear: units.Kip.Of(40), moment: units.KipFoot.Of(80)}
	b.ReportAllocs()
	sum := 0.0
	for b.Loop() {
		s := w.at(&us19, f)
		sum += s.design
	}
	_ = sum
}
