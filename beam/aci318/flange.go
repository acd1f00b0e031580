package aci318

import (
	"soffit.example/beam"
	"soffit.example/units"
)

// flangeSpread is the lesser of the effective flange width and ℓn/10 (24.3.4).
func (e *edition) flangeSpread(p *beam.Problem, f beam.Face) units.Length {
	if f == 0 || f != p.Brief.Section.Flange() {
		return units.Length{}
	}
	width := p.Geometry.FaceWidth(f)
	for span := 1; span <= p.Forces.Spans(); span++ {
		width = width.Min(p.ClearSpan(span).Scale(0.1))
	}
	return width
}
