package aci318

import (
	"math"
	"testing"

	"soffit.example/beam"
	"soffit.example/units"
)

// FuzzStrengths puts any numbers to the strengths of a section: it answers
// with an error, a refusal, or finite strengths.
func FuzzStrengths(f *testing.F) {
	f.Add(uint8(0), false, 16.0, 26.0, 4500.0, 3.16, 23.5, 60000.0, 0.4, 2.5, 250.0, 45.0, 9.0)
	f.Add(uint8(1), true, 300.0, 600.0, 30.0, 1.0, 0.0, 420.0, 0.0, 0.0, 0.0, 0.0, 0.0)
	f.Add(uint8(2), true, math.Inf(1), math.NaN(), -1.0, 1e300, -1e300, 1e-300, 5.0, 1.0, 1.0, 1.0, 1e-9)
	f.Fuzz(func(t *testing.T, edition uint8, hogging bool, b, h, fc, as1, d1, fy, as2, d2, mu, vu, s float64) {
		q := beam.SectionQuery{
			Section:  beam.Section{Width: in(b), Depth: in(h)},
			Concrete: beam.Concrete{Strength: psi(fc)},
			Bending:  beam.Positive,
			Layers:   []beam.SteelLayer{{Area: in2(as1), Depth: in(d1), Yield: psi(fy)}, {Area: in2(as2), Depth: in(d2), Yield: psi(fy)}},
			Stirrups: &beam.StirrupSteel{Area: in2(0.22), Spacing: in(s), Yield: psi(fy)},
			Demand:   beam.Demand{Moment: units.KipFoot.Of(mu), Shear: units.Kip.Of(vu)},
		}
		if hogging {
			q.Bending = beam.Negative
		}
		got, err := Editions()[edition%4].Strengths(q)
		if err != nil || len(got.Refusals) > 0 {
			return
		}
		for name, v := range map[string]units.Amount{
			"Mn": got.Flexure.Nominal.Amount(), "c": got.Flexure.NeutralAxis.Amount(), "strain": units.Plain(got.Flexure.ExtremeStrain),
			"φ": units.Plain(got.Flexure.Phi), "As,min": got.Flexure.MinimumSteel.Amount(),
			"Vn": got.Shear.Nominal.Amount(), "limit": got.Shear.SectionLimit.Amount(), "Tcr": got.Torsion.Cracking.Amount(),
		} {
			if !v.IsFinite() {
				t.Fatalf("%s is %v for %+v", name, v, q)
			}
		}
		for _, c := range got.Checks {
			if math.IsNaN(c.Utilization) || c.Outcome == 0 {
				t.Fatalf("%+v", c)
			}
		}
	})
}
