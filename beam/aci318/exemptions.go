package aci318

import (
	"soffit.example/beam"
	"soffit.example/units"
)

// exemption is a row of Table 9.6.3.1: a beam that needs least stirrups only
// where Vu exceeds φVc.
type exemption uint8

const (
	exemptShallow exemption = iota + 1 // h of at most 10 in. (250 mm)
	exemptJoist                        // a one-way joist of 9.8
	exemptSlab                         // integral with a slab
	exemptFibres                       // of steel-fibre concrete
)

// Integral with a slab: h is at most the greater of these times the slab and
// the web, both systems.
const (
	slabDepths = 2.5 // of tf
	slabWebs   = 0.5 // of bw
)

// castWithSlab reports whether a section is integral with a slab: a tee or an
// ell that has some of it beside its web, but for an isolated tee, whose flange
// is its own.
func castWithSlab(s *beam.Section) bool {
	return s.Flange() == beam.Top && !s.Isolated && (s.Width.Less(s.FlangeWidth) || !s.Slab.IsZero())
}

// exemption is the row of Table 9.6.3.1 that a section falls under; zero: none.
// The row of fibres goes by the shear too, and so comes last.
func (w *webShear) exemption(e *edition) exemption {
	r := &e.stirrups
	slab := e.lengthIn(w.slab)
	switch {
	case w.joist:
		return exemptJoist
	case units.AtMost(w.h, r.shallow):
		return exemptShallow
	case slab > 0 && units.AtMost(w.h, r.medium) && units.AtMost(w.h, max(slabDepths*slab, slabWebs*w.bw)):
		return exemptSlab
	case w.fibres && units.AtMost(w.h, r.medium) && units.AtMost(w.fc, r.fibreStrength):
		return exemptFibres
	}
	return 0
}

// note says why a beam is exempt.
func (x exemption) note(e *edition) string {
	r := &e.stirrups
	medium := e.length.Format(e.lengthOf(r.medium))
	switch x {
	case exemptShallow:
		return "exempt: the beam is no deeper than " + e.length.Format(e.lengthOf(r.shallow))
	case exemptJoist:
		return "exempt: a one-way joist of 9.8"
	case exemptSlab:
		return "exempt: cast with a slab, and no deeper than the greater of 2.5 tf and 0.5 bw, and than " + medium
	case exemptFibres:
		return "exempt: steel-fibre normalweight concrete of at most " + e.stress.Format(e.stressOf(r.fibreStrength)) + ", no deeper than " + medium
	}
	return ""
}
