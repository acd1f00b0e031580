package beam

import (
	"slices"

	"soffit.example/units"
)

// longitudinal is the mass of the bars of a pair, in kg.
func (s *search) longitudinal(bottom, top *barSet) float64 {
	return (bottom.mass + top.mass) * s.length()
}

// length of the bars in m: the whole beam, or one metre with demands.
func (s *search) length() float64 {
	if !s.member {
		return 1
	}
	return s.p.length().In(units.Metre)
}

// key ranks a layout under the chosen preference; less is better, and every
// entry grows with the stirrups, so that the key of a pair without stirrups
// bounds it from below.
func (s *search) key(bottom, top *barSet, mass float64, zones int) [2]float64 {
	switch s.prefer {
	case FewestBars:
		return [2]float64{float64(bottom.count + top.count), mass}
	case OneSize:
		return [2]float64{float64(differentSizes(bottom, top)), mass}
	case FewestMarks:
		return [2]float64{float64(bottom.rows() + top.rows() + zones), mass}
	case Shallowest:
		return [2]float64{s.p.Brief.Section.Depth.In(units.Metre), mass}
	}
	return [2]float64{mass}
}

func differentSizes(sets ...*barSet) int {
	var names []string
	for _, b := range sets {
		for _, l := range b.layers[:b.used] {
			for _, g := range l {
				if g.count > 0 && !slices.Contains(names, g.size.Name) {
					names = append(names, g.size.Name)
				}
			}
		}
		if b.flange.count > 0 && !slices.Contains(names, b.flange.size.Name) {
			names = append(names, b.flange.size.Name)
		}
	}
	return len(names)
}

// promising reports whether a pair could still be kept if its stirrups
// weighed no more than a given mass.
func (s *search) promising(bottom, top *barSet, stirrups float64) bool {
	return s.ranks(s.key(bottom, top, s.longitudinal(bottom, top)+stirrups, 1))
}

func (s *search) ranks(key [2]float64) bool {
	return len(s.kept) < s.keep || slices.Compare(key[:], s.kept[len(s.kept)-1].key[:]) < 0
}

// keepBest inserts a layout by rank. Of layouts with the same longitudinal
// bars only the best is kept, so that alternatives differ in more than a
// stirrup.
func (s *search) keepBest(f found) {
	same := slices.IndexFunc(s.kept, func(k found) bool {
		return k.bottom.barPlan == f.bottom.barPlan && k.top.barPlan == f.top.barPlan && k.inCompress == f.inCompress
	})
	if same >= 0 {
		if slices.Compare(f.key[:], s.kept[same].key[:]) >= 0 {
			return
		}
		s.kept = slices.Delete(s.kept, same, same+1)
	}
	at := len(s.kept) // after its equals, which were tried before it for a reason
	for at > 0 && slices.Compare(f.key[:], s.kept[at-1].key[:]) < 0 {
		at--
	}
	s.kept = slices.Insert(s.kept, at, f)
	if len(s.kept) > s.keep {
		s.kept = s.kept[:s.keep]
	}
}
