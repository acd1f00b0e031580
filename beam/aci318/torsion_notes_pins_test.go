package aci318

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

func assumedIn(r *beam.Result, id string) (out []beam.Assumption) {
	for _, a := range r.Assumptions {
		if a.ID == id {
			out = append(out, a)
		}
	}
	return out
}

// Every reading of torsion is named once: θ as it is taken (22.7.6.1.2), how the
// steel is spread (9.7.5.1), the hooks (25.7.1.6).
func TestReadingsOfTorsionAreNamed(t *testing.T) {
	for angle, says := range map[float64]string{0: "at 45 degrees", 35: "at 35 degrees"} {
		r := twisted(t, ACI31819(), func(b *beam.Brief, _ *beam.Layout) { b.Readings.TorsionAngle = angle })
		list := assumedIn(r, "reading.torsion-angle")
		require.Len(t, list, 1)
		require.Contains(t, list[0].Assumed, says)
		require.True(t, list[0].Holds)
		require.Len(t, assumedIn(r, "reading.torsion-shares"), 1)
		require.Len(t, assumedIn(r, "torsion.stirrup-hooks"), 1)
		require.Empty(t, assumedIn(r, "reading.torsion-extent"), "a section by itself")
		require.Empty(t, assumedIn(r, "torsion.redistribution"), "nothing is shed")
		require.Empty(t, assumedIn(r, "reading.torsion-outline"))
	}
	r := twisted(t, ACI31819(), func(b *beam.Brief, _ *beam.Layout) { b.Demands[0].Torque = units.KipFoot.Of(5) })
	require.Empty(t, assumedIn(r, "reading.torsion-angle"), "a torque that is neglected")
}

// What is shed by 22.7.3.2 is told with where it is greatest, and under which
// combination. φTcr of twistedBrief is 0.75 × 4√4000 × 448²/88 lb-in. = 36.06
// kip-ft.
func TestWhatIsShedIsTold(t *testing.T) {
	r := twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) {
		b.Demands = []beam.Demand{b.Demands[0], b.Demands[0], b.Demands[0]}
		for i, torque := range []float64{40, 50, 45} {
			b.Demands[i].Name = string(rune('A' + i))
			b.Demands[i].Torque, b.Demands[i].Path = units.KipFoot.Of(torque), beam.CompatibilityTorque
		}
	})
	list := assumedIn(r, "torsion.redistribution")
	require.Len(t, list, 1)
	require.Contains(t, list[0].Found, "13.9")
	require.Contains(t, list[0].Found, "B")
	require.NotContains(t, list[0].Found, "span")

	// Axial tension lowers φTcr of its own combination only (22.7.5.1).
	r = twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) {
		b.Demands = []beam.Demand{b.Demands[0], b.Demands[0]}
		for i, axial := range []float64{0, -60} {
			b.Demands[i].Name = string(rune('A' + i))
			b.Demands[i].Torque, b.Demands[i].Path, b.Demands[i].Axial = units.KipFoot.Of(45), beam.CompatibilityTorque, units.Kip.Of(axial)
		}
	})
	list = assumedIn(r, "torsion.redistribution")
	require.Len(t, list, 1)
	require.Contains(t, list[0].Found, "B")

	// In a span it is told where: 1.4 × 80/2 kip-ft to either end.
	r = twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) {
		twistedSpan(80, 12)(b, l)
		b.Loads[1].Path = beam.CompatibilityTorque
	})
	list = assumedIn(r, "torsion.redistribution")
	require.Len(t, list, 1)
	require.Contains(t, list[0].Found, "in span 1")
	require.Contains(t, list[0].Found, "19.9")
	require.Len(t, assumedIn(r, "reading.torsion-extent"), 1)
}
