package beam

import (
	"context"

	"soffit.example/units"
)

// cureSteps bounds how far a change is driven: depth and width to about
// twice, strength by as many steps.
const cureSteps = 16

// cures tries single changes of a brief that fails and reports those that
// were designed and found to pass. A change is driven in growing steps until
// it does, then back to the smallest step found to.
func cures(ctx context.Context, code Code, brief Brief, r *Result) ([]Cure, error) {
	side, strength := units.Inch.Of(2), units.PSI.Of(500)
	if r.System == units.SI {
		side, strength = units.Millimetre.Of(50), units.Megapascal.Of(5)
	}
	changes := []struct {
		name  string
		apply func(b *Brief, k int) (from, to units.Amount)
	}{
		{"depth", func(b *Brief, k int) (from, to units.Amount) {
			from = b.Section.Depth.Amount()
			b.Section.Depth = b.Section.Depth.Add(side.Scale(float64(k)))
			return from, b.Section.Depth.Amount()
		}},
		{"width", func(b *Brief, k int) (from, to units.Amount) {
			from = b.Section.Width.Amount()
			b.Section.Width = b.Section.Width.Add(side.Scale(float64(k)))
			return from, b.Section.Width.Amount()
		}},
		{"concrete strength", func(b *Brief, k int) (from, to units.Amount) {
			from = b.Concrete.Strength.Amount()
			b.Concrete.Strength = b.Concrete.Strength.Add(strength.Scale(float64(k)))
			return from, b.Concrete.Strength.Amount()
		}},
		{"stirrup legs", func(b *Brief, k int) (from, to units.Amount) {
			legs := &r.Problem.Brief.Preferences.MaxLegs
			b.Preferences.MaxLegs = min(*legs+k, mostLegs)
			return units.Plain(float64(*legs)), units.Plain(float64(b.Preferences.MaxLegs))
		}},
	}
	var out []Cure
	for _, change := range changes {
		var done Cure
		passes := func(k int) (bool, error) {
			b := brief.clone()
			from, to := change.apply(&b, k)
			b.Preferences.KeepBest, b.Preferences.Depths = -1, nil
			c, err := design(ctx, code, b, true)
			if err != nil {
				if ctx.Err() != nil {
					return false, err
				}
				return false, nil // beyond what a brief may say: no cure
			}
			if c.Verdict != Satisfied {
				return false, nil
			}
			done = Cure{Change: change.name, From: from, To: to}
			if c.Governing != nil {
				done.Governing, done.Utilization = c.Governing.ID, c.Governing.Utilization
			}
			return true, nil
		}
		fails, k := 0, 1
		ok, err := passes(k)
		for ; !ok && err == nil && k < cureSteps; ok, err = passes(k) {
			fails, k = k, 2*k
		}
		for err == nil && ok && k-fails > 1 {
			mid := (fails + k) / 2
			var better bool
			if better, err = passes(mid); better {
				k = mid
			} else {
				fails = mid
			}
		}
		if err != nil {
			return nil, err
		}
		if ok {
			out = append(out, done)
		}
	}
	return out, nil
}
