package proof

import (
	"context"
	"math"
	"slices"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/beam"
	"soffit.example/beam/internal/briefs"
	"soffit.example/units"
)

// apart is how far the printed SI coefficients move a utilization from that of
// the inch-pound edition, at most. The SI coefficients are rounded: √f'c terms
// by up to 2.4 % (0.17 for 2), stress terms by 1.5 % (1.4 MPa for 200 psi,
// 28 MPa for 4000 psi, 420 MPa for 60 ksi), lengths by 1.6 % (25 mm for 1 in),
// which between layers moves d a little too.
var apart = map[string]float64{
	"flexure.positive":         0.01,
	"flexure.negative":         0.01,
	"flexure.minimum.positive": 0.018,
	"flexure.minimum.negative": 0.018,
	"flexure.strain.positive":  0.03, // a difference of strains, of which β1 moves one
	"flexure.strain.negative":  0.03,
	"shear.strength":           0.025,
	"shear.section-limit":      0.025,
	"depth.minimum":            0.011,
	"spacing.clear":            0.017,
	"spacing.layers":           0.017,
	"stirrup.bends":            0,
	"bracing.spacing":          0,
}

// TestInchAndMetricEditions judges the same beam by an edition and by its SI
// twin: every check that both make differs by no more than the rounding of the
// SI coefficients explains.
func TestInchAndMetricEditions(t *testing.T) {
	seen := map[string]int{}
	worst := map[string]float64{}
	rapid.Check(t, func(t *rapid.T) {
		s := anySample(t)
		if s.Kind != briefs.Sound || strings.Contains(s.Code, "M") {
			t.Skip("not a sound brief in inch-pound units")
		}
		b := s.Brief
		b.Reinforcement.Yield, b.Reinforcement.StirrupYield = units.KSI.Of(60), units.KSI.Of(60)
		b.Cover, b.Concrete.Aggregate = units.Inch.Of(1.5), units.Inch.Of(0.75)
		b.Concrete.Density, b.Concrete.Kind = units.PoundPerCubicFoot.Of(150), beam.Normalweight
		b.Concrete.Strength = b.Concrete.Strength.Min(units.KSI.Of(10))
		b.Concrete.Splitting, b.Concrete.Normal, b.Concrete.Fibres = units.Stress{}, 0, false
		b.Readings.RoundedYield = false
		twin := codes[strings.Replace(s.Code, "318-", "318M-", 1)]
		inch, err := beam.Design(context.Background(), codes[s.Code], b)
		require.NoError(t, err)
		if inch.Verdict != beam.Satisfied {
			t.Skip("not satisfied")
		}
		b = designedAs(b, inch.Section.Depth)
		metric, err := beam.CheckLayout(context.Background(), twin, b, inch.Layout)
		require.NoError(t, err)
		if sameRow(inch, metric) {
			for i := range inch.Checks {
				c := &inch.Checks[i]
				most, compared := apart[c.ID]
				other := like(inch, metric, i)
				if !compared || other == nil || c.Utilization == 0 {
					continue
				}
				off := math.Abs(other.Utilization/c.Utilization - 1)
				require.LessOrEqualf(t, off, most+1e-9, "%s: %g in inches, %g in SI", c.ID, c.Utilization, other.Utilization)
				seen[c.ID]++
				worst[c.ID] = math.Max(worst[c.ID], off)
			}
		}
	})
	t.Logf("checks compared: %v", seen)
	t.Logf("farthest apart: %v", worst)
	require.Greater(t, seen["flexure.positive"], 5)
	require.Greater(t, seen["shear.strength"], 5)
}

// sameRow reports whether both editions find the stirrups at least the least,
// or both do not: the limits differ by rounding, and a beam between them has
// another expression for Vc.
func sameRow(a, b *beam.Result) bool {
	holds := func(r *beam.Result) bool {
		for _, x := range r.Assumptions {
			if x.ID == "shear.least-stirrups" {
				return x.Holds
			}
		}
		return true
	}
	return holds(a) == holds(b)
}

// like is the check of b that answers to check i of a, if both were judged
// and took the same way: those of one id come in the same order.
func like(a, b *beam.Result, i int) *beam.Check {
	c, n := &a.Checks[i], 0
	for k := range a.Checks[:i] {
		if a.Checks[k].ID == c.ID {
			n++
		}
	}
	for k := range b.Checks {
		o := &b.Checks[k]
		if o.ID != c.ID {
			continue
		}
		if n--; n >= 0 {
			continue
		}
		if o.Combination == c.Combination && math.Abs(o.At.Sub(c.At).In(units.Metre)) < 0.02 && judged(o) && judged(c) && sameSteps(o, c) {
			return o
		}
		return nil
	}
	return nil
}

func judged(c *beam.Check) bool { return c.Outcome == beam.Pass || c.Outcome == beam.Fail }

// sameSteps reports whether two checks took the same way: 24 in is more than
// 600 mm, and stirrups may count by one edition and not by its twin.
func sameSteps(a, b *beam.Check) bool {
	return a.Clause == b.Clause && slices.EqualFunc(a.Steps, b.Steps, func(x, y beam.Step) bool { return x.Symbol == y.Symbol && x.Note == y.Note })
}
