package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// shearMids are like sections in the units of each edition: 14 by 20 in. and
// 350 by 500 mm with √f'c = 70 psi or 5 MPa and without stirrups.
var shearMids = map[*edition]shearCase{
	&us14: {fc: 4900, lambda: 1, bw: 14, h: 20, d: 17, as: 2.38, fyt: 60000},
	&us19: {fc: 4900, lambda: 1, bw: 14, h: 20, d: 17, as: 2.38, fyt: 60000},
	&si14: {fc: 25, lambda: 1, bw: 350, h: 500, d: 425, as: 1487.5, fyt: 420},
	&si19: {fc: 25, lambda: 1, bw: 350, h: 500, d: 425, as: 1487.5, fyt: 420},
}

// bareShear is Vc of such a section without stirrups, written out: 2 λ√f'c bw d
// of 318-14 (0.17 in SI), row (c) of 318-19 with ρw = As/(bw d).
func bareShear(e *edition, c shearCase) float64 {
	rho := c.as / (c.bw * c.d)
	switch e {
	case &us14:
		return 2 * c.lambda * math.Sqrt(c.fc) * c.bw * c.d
	case &si14:
		return 0.17 * c.lambda * math.Sqrt(c.fc) * c.bw * c.d
	case &us19:
		return 8 * min(1, math.Sqrt(2/(1+c.d/10))) * c.lambda * math.Cbrt(rho) * math.Sqrt(c.fc) * c.bw * c.d
	default:
		return 0.66 * min(1, math.Sqrt(2/(1+0.004*c.d))) * c.lambda * math.Cbrt(rho) * math.Sqrt(c.fc) * c.bw * c.d
	}
}

// generalTrigger is the shear above which 9.6.3.1 asks for stirrups of a beam
// that is not exempt, written out.
func generalTrigger(e *edition, c shearCase) float64 {
	switch e {
	case &us19:
		return 0.75 * c.lambda * math.Sqrt(c.fc) * c.bw * c.d
	case &si19:
		return 0.75 * 0.083 * c.lambda * math.Sqrt(c.fc) * c.bw * c.d
	}
	return 0.5 * 0.75 * bareShear(e, c)
}

// Table 9.6.3.1, every row from both sides in every edition. The limits are
// printed: h of 10 in. (250 mm); cast with a slab, the greater of 2.5 tf and
// 0.5 bw, and 24 in. (600 mm); steel fibres, f'c of 6000 psi (40 MPa) and h of
// 24 in. (600 mm); joists.
func TestExemptionsFromLeastStirrups(t *testing.T) {
	type at struct {
		name    string
		edit    func(c *shearCase, unit func(us, si float64) float64)
		exempts exemption
	}
	for _, k := range []at{
		{"none", func(c *shearCase, u func(us, si float64) float64) {}, 0},
		{"h at 10 in", func(c *shearCase, u func(us, si float64) float64) { c.h, c.d = u(10, 250), u(8, 200) }, exemptShallow},
		{"h above 10 in", func(c *shearCase, u func(us, si float64) float64) { c.h, c.d = u(10.001, 250.01), u(8, 200) }, 0},
		// 2.5 × 8 in. = 20 in. = h; 2.5 × 200 mm = 500 mm.
		{"slab, h at 2.5 tf", func(c *shearCase, u func(us, si float64) float64) { c.slab = u(8, 200) }, exemptSlab},
		{"slab, h above 2.5 tf", func(c *shearCase, u func(us, si float64) float64) { c.slab = u(7.999, 199.99) }, 0},
		// 0.5 × 40 in. = 20 in. = h.
		{"slab, h at 0.5 bw", func(c *shearCase, u func(us, si float64) float64) { c.slab, c.bw = u(4, 100), u(40, 1000) }, exemptSlab},
		{"slab, h above 0.5 bw", func(c *shearCase, u func(us, si float64) float64) { c.slab, c.bw = u(4, 100), u(39.99, 999.9) }, 0},
		{"a wide beam without a slab", func(c *shearCase, u func(us, si float64) float64) { c.bw = u(60, 1500) }, 0},
		{"slab, h at 24 in", func(c *shearCase, u func(us, si float64) float64) { c.slab, c.h = u(10, 250), u(24, 600) }, exemptSlab},
		{"slab, h above 24 in", func(c *shearCase, u func(us, si float64) float64) { c.slab, c.h = u(10, 250), u(24.01, 600.1) }, 0},
		{"fibres, all at their limits", func(c *shearCase, u func(us, si float64) float64) {
			c.fibres, c.h, c.fc = true, u(24, 600), u(6000, 40)
		}, exemptFibres},
		{"fibres, h above 24 in", func(c *shearCase, u func(us, si float64) float64) { c.fibres, c.h = true, u(24.01, 600.1) }, 0},
		{"fibres, f'c above 6000 psi", func(c *shearCase, u func(us, si float64) float64) { c.fibres, c.fc = true, u(6001, 40.01) }, 0},
		{"joist", func(c *shearCase, u func(us, si float64) float64) { c.joist = true }, exemptJoist},
	} {
		for _, c := range Editions() {
			e := c.e
			t.Run(k.name+" "+e.id, func(t *testing.T) {
				s := shearMids[e]
				k.edit(&s, func(us, si float64) float64 {
					if e.system == units.US {
						return us
					}
					return si
				})
				want := generalTrigger(e, s)
				switch vc := bareShear(e, s); k.exempts {
				case exemptFibres:
					want = 0.75 * min(vc, 2*math.Sqrt(s.fc)*s.bw*s.d)
					if e.system == units.SI {
						want = 0.75 * min(vc, 0.17*math.Sqrt(s.fc)*s.bw*s.d)
					}
				case exemptJoist:
					want = 0.75 * 1.1 * vc
				case exemptShallow, exemptSlab:
					want = 0.75 * vc
				}
				for _, share := range []float64{1, 1 + 1e-6} {
					s.vu = want * share
					w, v := s.evaluate(e)
					require.Equal(t, k.exempts, w.exempt)
					require.InEpsilon(t, want, v.trigger, 1e-12)
					require.Equal(t, share > 1, !units.AtMost(v.shear, v.trigger))
				}
				require.Equal(t, k.exempts == 0, k.exempts.note(e) == "")
			})
		}
	}
}

// Steel fibres stand in for least stirrups up to φ 2√f'c bw d (0.17 in SI) only,
// however much more the concrete carries: with ρw = 4 % at d = 17 in. row (c)
// gives 8 √(2/2.7) 0.342 = 2.35 √f'c bw d, and the detailed expressions of 318-14
// give 3.33.
func TestFibresUpToTheirOwnShear(t *testing.T) {
	for _, e := range []*edition{&us14, &us19, &si14, &si19} {
		s := shearMids[e]
		s.fibres, s.as, s.method = true, 0.04*s.bw*s.d, beam.DetailedShear
		_, v := s.evaluate(e)
		k := 2.0
		if e.system == units.SI {
			k = 0.17
		}
		require.InEpsilon(t, 0.75*k*math.Sqrt(s.fc)*s.bw*s.d, v.trigger, 1e-12, e.id)
		require.Greater(t, v.bare.strength, v.trigger/0.75, e.id)
	}
}

// What makes a brief exempt is read off its section and its concrete.
func TestExemptionFollowsTheSection(t *testing.T) {
	tee := beam.Section{Shape: beam.Tee, Width: in(14), Depth: in(15), FlangeThickness: in(6), FlangeWidth: in(40)}
	for _, k := range []struct {
		name     string
		section  beam.Section
		concrete beam.Concrete
		want     exemption
	}{
		{"tee", tee, beam.Concrete{}, exemptSlab},
		{"tee no wider than its web", beam.Section{Shape: beam.Tee, Width: in(14), Depth: in(15), FlangeThickness: in(6), FlangeWidth: in(14)}, beam.Concrete{}, 0},
		{"ell", beam.Section{Shape: beam.Ell, Width: in(14), Depth: in(15), FlangeThickness: in(6), FlangeWidth: in(30)}, beam.Concrete{}, exemptSlab},
		{"isolated tee", beam.Section{Shape: beam.Tee, Width: in(14), Depth: in(15), FlangeThickness: in(6), FlangeWidth: in(40), Isolated: true}, beam.Concrete{}, 0},
		{"inverted tee", beam.Section{Shape: beam.InvertedTee, Width: in(14), Depth: in(15), FlangeThickness: in(6), FlangeWidth: in(40)}, beam.Concrete{}, 0},
		{"rectangle", beam.Section{Shape: beam.Rectangular, Width: in(30), Depth: in(15)}, beam.Concrete{}, 0},
		{"fibres", beam.Section{Shape: beam.Rectangular, Width: in(14), Depth: in(20)}, beam.Concrete{Fibres: true}, exemptFibres},
		{"fibres, normalweight said", beam.Section{Shape: beam.Rectangular, Width: in(14), Depth: in(20)}, beam.Concrete{Fibres: true, Kind: beam.Normalweight}, exemptFibres},
		{"fibres in lightweight concrete", beam.Section{Shape: beam.Rectangular, Width: in(14), Depth: in(20)},
			beam.Concrete{Fibres: true, Kind: beam.SandLightweight, Density: units.PoundPerCubicFoot.Of(110)}, 0},
	} {
		k.concrete.Strength = psi(4000)
		g, faults := beam.GeometryOf(&k.section)
		require.Empty(t, faults)
		s := us19.shearSection(&k.section, &g, &k.concrete, &beam.Readings{})
		s.stirrups.yield, s.depth, s.area = psi(60000), in(12.5), in2(2)
		w := us19.newWebSteel(&s)
		require.Equal(t, k.want, w.exempt, k.name)
	}
}
