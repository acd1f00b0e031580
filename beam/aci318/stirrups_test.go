package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/units"
)

// 9.6.3.1: 318-14 asks for stirrups above 0.5 φVc, 318-19 above φλ√f'c bw d.
// Own calculation from the clause: 12 by 20 in., d = 17.5 in., 4900 psi, so
// that √f'c = 70 psi; φ = 0.75.
func TestWhenStirrupsAreRequired(t *testing.T) {
	us := shearCase{fc: 4900, lambda: 1, bw: 12, h: 20, d: 17.5, as: 2, fyt: 60000}
	si := shearCase{fc: 25, lambda: 1, bw: 300, h: 500, d: 440, as: 2640, fyt: 420}
	for _, c := range []struct {
		name    string
		e       *edition
		c       shearCase
		trigger float64
	}{
		{"14", &us14, us, 0.5 * 0.75 * 2 * 70 * 210},
		{"19", &us19, us, 0.75 * 70 * 210},
		{"14M", &si14, si, 0.5 * 0.75 * 0.17 * 5 * 132000},
		{"19M", &si19, si, 0.75 * 0.083 * 5 * 132000},
	} {
		t.Run(c.name, func(t *testing.T) {
			for _, k := range []struct {
				share    float64
				required bool
			}{{1, false}, {1.000001, true}, {0.9, false}} {
				c.c.vu = c.trigger * k.share
				_, s := c.c.evaluate(c.e)
				require.InEpsilon(t, c.trigger, s.trigger, 1e-12)
				require.Equal(t, k.required, s.required, "at %g of the trigger", k.share)
			}
		})
	}
}

// In 318-19 a beam without stirrups must pass φλ√f'c bw d and φVc by row (c);
// with little steel and much depth the second governs: with ρw = 0.3 % and d =
// 30 in., 8 λs ρw^(1/3) = 0.82 < 1.
func TestSizeEffectCanGovernBeforeTheTrigger(t *testing.T) {
	c := shearCase{fc: 4900, lambda: 1, bw: 12, h: 33, d: 30, as: 0.003 * 360, fyt: 60000}
	c.vu = 0.9 * 0.75 * 70 * 360
	_, s := c.evaluate(&us19)
	require.InDelta(t, 0.82, s.concrete.strength/(70*360), 0.005)
	require.Less(t, s.shear, s.trigger)
	require.Greater(t, s.shear, s.design)
	require.True(t, s.required, "strength calls for stirrups though 9.6.3.1 does not")
}

// Table 9.6.3.1 exempts beams up to 10 in. (250 mm): only Vu > φVc counts.
func TestShallowBeamsAreExempt(t *testing.T) {
	us := shearCase{fc: 4900, lambda: 1, bw: 12, h: 10, d: 8, as: 1.2, fyt: 60000}
	row := 8 * math.Cbrt(1.2/96) * 70 * 96 // λs = 1
	for _, c := range []struct {
		name    string
		e       *edition
		c       shearCase
		trigger float64
	}{
		{"14", &us14, us, 0.75 * 2 * 70 * 96},
		{"19", &us19, us, 0.75 * row},
		{"14M", &si14, shearCase{fc: 25, lambda: 1, bw: 300, h: 250, d: 200, as: 700, fyt: 420}, 0.75 * 0.17 * 5 * 60000},
	} {
		w, s := c.c.evaluate(c.e)
		require.Equal(t, exemptShallow, w.exempt, c.name)
		require.InEpsilon(t, c.trigger, s.trigger, 1e-12, c.name)
		c.c.h += c.c.h * 1e-6
		w, s = c.c.evaluate(c.e)
		require.Zero(t, w.exempt, c.name)
		require.Less(t, s.trigger, c.trigger, c.name)
	}
}

// Table 9.6.3.3 (318-14) or 9.6.3.4 (318-19): the terms cross at 4444 psi.
func TestLeastStirrupArea(t *testing.T) {
	for _, c := range []struct {
		name   string
		e      *edition
		fc, bw float64
		fyt    float64
		want   float64
	}{
		{"14 floor", &us14, 4000, 12, 60000, 50 * 12.0 / 60000},
		{"19 floor", &us19, 4000, 12, 60000, 50 * 12.0 / 60000},
		{"19 crossing", &us19, 4444.4444444444444, 12, 60000, 50 * 12.0 / 60000},
		{"19 root", &us19, 6400, 12, 60000, 0.75 * 80 * 12 / 60000},
		{"14M floor", &si14, 25, 300, 420, 0.35 * 300 / 420},
		{"19M root", &si19, 36, 300, 420, 0.062 * 6 * 300 / 420},
		{"Grade 40", &us14, 4000, 12, 40000, 50 * 12.0 / 40000},
		{"fyt capped at 60 ksi", &us19, 4000, 12, 80000, 50 * 12.0 / 60000},
		{"fyt capped at 420 MPa", &si19, 25, 300, 550, 0.35 * 300 / 420},
	} {
		w, _ := shearCase{fc: c.fc, lambda: 0.75, bw: c.bw, h: 2 * c.bw, d: 1.8 * c.bw, as: 2, fyt: c.fyt}.evaluate(c.e)
		require.InEpsilon(t, c.want, w.least, 1e-12, c.name) // no λ in either term
	}
}

// Vs = Av fyt d/s with fyt no more than 60 ksi or 420 MPa (Table 20.2.2.4), and
// nothing where the stirrups are further apart than d/2 or 24 in.
func TestStirrupStrength(t *testing.T) {
	us := shearCase{fc: 4000, lambda: 1, bw: 12, h: 20, d: 17.5, as: 2, av: 0.22, s: 8, fyt: 60000}
	w, s := us.evaluate(&us19)
	require.InEpsilon(t, 0.22*60000*17.5/8, w.steel, 1e-12)
	require.InEpsilon(t, 0.75*(2*math.Sqrt(4000)*210+0.22*60000*17.5/8), s.design, 1e-12)

	us.fyt = 100000
	w, _ = us.evaluate(&us19)
	require.True(t, w.fytCapped)
	require.InEpsilon(t, 0.22*60000*17.5/8, w.steel, 1e-12)

	us.s = 8.75 + 1e-6
	w, _ = us.evaluate(&us19)
	require.True(t, w.wide)
	require.Zero(t, w.steel)

	deep := shearCase{fc: 4000, lambda: 1, bw: 20, h: 60, d: 56, as: 10, av: 0.8, s: 24, fyt: 60000}
	w, _ = deep.evaluate(&us14)
	require.False(t, w.wide) // d/2 = 28 in., but no more than 24 in.
	deep.s = 24.001
	w, _ = deep.evaluate(&us14)
	require.True(t, w.wide)
}

// Table 9.7.6.2.2: the class follows the required Vs = Vu/φ - Vc, not Vu and
// not the Vs provided. Own calculation: √f'c = 70 psi, bw d = 210 in2, Vc =
// 29,400 lb, 4√f'c bw d = 58,800 lb, so that the class changes at Vu = 66,150 lb.
func TestSpacingClassFollowsRequiredVs(t *testing.T) {
	us := shearCase{fc: 4900, lambda: 1, bw: 12, h: 20, d: 17.5, as: 2, av: 0.8, s: 4, fyt: 60000}
	for _, c := range []struct {
		name          string
		e             *edition
		vu            float64
		heavy         bool
		along, across float64
	}{
		{"14 light", &us14, 66150, false, 8.75, 0},
		{"14 heavy", &us14, 66151, true, 4.375, 0},
		{"19 light", &us19, 66150, false, 8.75, 17.5},
		{"19 heavy", &us19, 66151, true, 4.375, 8.75},
		{"19 light, though Vs provided is heavy", &us19, 30000, false, 8.75, 17.5},
	} {
		us.vu = c.vu
		w, s := us.evaluate(c.e)
		require.Greater(t, w.steel, w.heavyFrom, c.name)
		require.Equal(t, c.heavy, s.heavy, c.name)
		require.InEpsilon(t, c.along, s.along, 1e-12, c.name)
		require.InDelta(t, c.across, s.across, 1e-9, c.name)
	}

	// The caps in inches and millimetres govern deep beams.
	for _, c := range []struct {
		e             *edition
		c             shearCase
		along, across float64
	}{
		{&us19, shearCase{fc: 4900, lambda: 1, bw: 20, h: 60, d: 56, as: 10, fyt: 60000, vu: 100000}, 24, 24},
		{&us19, shearCase{fc: 4900, lambda: 1, bw: 20, h: 60, d: 56, as: 10, fyt: 60000, vu: 500000}, 12, 12},
		{&si19, shearCase{fc: 25, lambda: 1, bw: 500, h: 1500, d: 1400, as: 6500, fyt: 420, vu: 4e5}, 600, 600},
		{&si19, shearCase{fc: 25, lambda: 1, bw: 500, h: 1500, d: 1400, as: 6500, fyt: 420, vu: 3e6}, 300, 300},
	} {
		_, s := c.c.evaluate(c.e)
		require.InEpsilon(t, c.along, s.along, 1e-12, c.e.id)
		require.InEpsilon(t, c.across, s.across, 1e-12, c.e.id)
	}
}

// Legs stand evenly between the outer two, whose centres lie cover + dst/2
// from the sides. Own calculation.
func TestLegsAreSpreadEvenly(t *testing.T) {
	width, cover, tie := units.Inch.Of(24), units.Inch.Of(1.5), units.Inch.Of(0.5)
	require.InEpsilon(t, 20.5, legSpacing(width, cover, tie, 2).In(units.Inch), 1e-12)
	require.InEpsilon(t, 20.5, legSpacing(width, cover, tie, 1).In(units.Inch), 1e-12, "a single leg leaves the whole width")
	require.InEpsilon(t, 20.5/3, legSpacing(width, cover, tie, 4).In(units.Inch), 1e-12)
}
