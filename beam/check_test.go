package beam_test

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

func TestCompare(t *testing.T) {
	kip := func(v float64) units.Amount { return units.Kip.Of(v).Amount() }
	tests := []struct {
		name             string
		demand, capacity float64
		utilization      float64
		want             beam.Outcome
	}{
		{"below", 40, 50, 0.8, beam.Pass},
		{"met exactly", 50, 50, 1, beam.Pass},
		{"above by rounding only", 50 * (1 + 5e-10), 50, 1, beam.Pass},
		{"above by a little more", 50 * (1 + 5e-9), 50, 1, beam.Fail},
		{"above", 60, 50, 1.2, beam.Fail},
		{"nothing asked", 0, 50, 0, beam.Pass},
		{"nothing asked of nothing", 0, 0, 0, beam.Pass},
		{"asked of nothing", 1, 0, beam.NoCapacity, beam.Fail},
		{"asked of less than nothing", 1, -5, beam.NoCapacity, beam.Fail},
		{"asked of next to nothing", 1e6, 1e-9, beam.NoCapacity, beam.Fail},
	}
	for _, tt := range tests {
		t.Run(tt.name, func(t *testing.T) {
			var c beam.Check
			c.Compare(kip(tt.demand), kip(tt.capacity))
			require.Equal(t, tt.want, c.Outcome)
			require.InDelta(t, tt.utilization, c.Utilization, 1e-8*tt.utilization)
		})
	}
}

func TestGoverning(t *testing.T) {
	checks := []beam.Check{
		{ID: "cover", Utilization: 1, Outcome: beam.Pass, Detailing: true},
		{ID: "flexure", Utilization: 0.9, Outcome: beam.Pass},
		{ID: "shear", Utilization: 0.7, Outcome: beam.Pass},
		{ID: "seismic", Outcome: beam.NotJudged},
	}
	require.Equal(t, "flexure", beam.Governing(checks).ID)
	checks[0].Outcome, checks[0].Utilization = beam.Fail, 1.1
	require.Equal(t, "cover", beam.Governing(checks).ID, "a rule of arrangement governs if it fails")
	require.Nil(t, beam.Governing(checks[3:]))
	require.True(t, beam.Failing(checks))
	require.False(t, beam.Failing(checks[1:]))
}

func TestRegister(t *testing.T) {
	var r beam.Register
	r.Assume(beam.Assumption{ID: "d", Assumed: "22 in", Open: true})
	r.Assume(beam.Assumption{ID: "weight", Assumed: "0.3 kip/ft"})
	r.Assume(beam.Assumption{ID: "d", Assumed: "21 in", Open: true})
	r.Settle("d", "20 in", false)
	r.Settle("unknown", "", true)
	all := r.All()
	require.Len(t, all, 2)
	require.Equal(t, beam.Assumption{ID: "d", Assumed: "21 in", Found: "20 in"}, all[0])
}
