package aci318

import (
	"soffit.example/beam"
	"soffit.example/units"
)

// WidestSpacing is the greatest spacing of stirrups along a beam that Table
// 9.7.6.2.2 permits at an effective depth, where the required Vs is small.
func (c Code) WidestSpacing(_ *beam.Problem, depth units.Length) units.Length {
	e := c.e
	return depth.Scale(alongShare).Min(e.lengthOf(e.stirrups.most))
}
