package beam

import (
	"math"

	"soffit.example/bars"
	"soffit.example/units"
)

// sets lists the sets of bars worth trying at a face inside a stirrup size,
// lightest first. A face that is never in tension gets bars to hold the
// stirrups.
func (s *search) sets(face Face, tie bars.Size) []barSet {
	sense := tensionSense(face)
	bent := s.bent(sense)
	var sets []barSet
	most := 0 // of a size in a layer; in turn, of the next smaller one
	for i := range s.main {
		size := &s.main[i]
		if !bent && s.p.Twisted {
			most, _, _ := s.bounds(sense, tie, size)
			sets = uniformSets(sets, size, 2, most, 1)
			continue
		}
		if !bent {
			if len(sets) == 0 && (tie.Area.AtMost(size.Area) || i == len(s.main)-1) {
				sets = uniformSets(sets, size, 2, s.p.Brief.Preferences.MaxLegs, 1)
			}
			continue
		}
		smaller := most
		var least units.Area
		var ok bool
		if most, least, ok = s.bounds(sense, tie, size); !ok || most < 2 {
			continue
		}
		fewest := int(math.Ceil(least.Ratio(size.Area)-1e-9)) - 1 // one too few is tried, for the record
		room := s.flangeRoom(face, tie, size)
		if room.sides > 0 {
			fewest = 2
		}
		uniform := uniformSets(nil, size, fewest, most, s.p.Brief.Preferences.MaxLayers)
		sets = append(sets, room.withFlange(uniform, size, least, s.p.Brief.Preferences.SpacingBy)...)
		if s.p.Brief.Preferences.Mixed && i > 0 && room.sides > 0 {
			small := s.flangeRoom(face, tie, &s.main[i-1])
			sets = append(sets, small.withFlange(uniform, &s.main[i-1], least, s.p.Brief.Preferences.SpacingBy)...)
		}
		if room.sides == 0 && s.p.Brief.Preferences.Mixed && i > 0 && s.main[i].Order == s.main[i-1].Order+1 {
			sets = mixedSets(sets, size, &s.main[i-1], least, most, smaller, s.p.Brief.Preferences.MaxLayers)
		}
	}
	sets = s.bundled(sets, face, tie)
	sortSets(sets)
	return sets
}

// bundled appends sets of bundles, two to a layer or more, at a face that is
// in tension.
func (s *search) bundled(sets []barSet, face Face, tie bars.Size) []barSet {
	if sense := tensionSense(face); len(s.bundles) > 0 && s.bent(sense) {
		for i := range s.bundles {
			unit := &s.bundles[i]
			if most, least, ok := s.bounds(sense, tie, unit); ok && most >= 2 {
				fewest := int(math.Ceil(least.Ratio(unit.Area)-1e-9)) - 1
				sets = uniformSets(sets, unit, fewest, most, s.p.Brief.Preferences.MaxLayers)
			}
		}
	}
	return sets
}

// flangeRoom is the room beside the web for bars of a size at a face in tension
// whose steel the code spreads over a flange. With the smaller of two sizes it
// is right for the larger in the web, whose outermost bar stands further in.
func (s *search) flangeRoom(face Face, tie bars.Size, size *bars.Size) (r flangeRoom) {
	web := s.p.Brief.Section.Width
	beyond := s.p.Code.Spread(s.p.Problem, face).Sub(web).Scale(0.5)
	s.t.enclose(tie, *size)
	radius := size.Diameter.Scale(0.5)
	// A bar beside the web begins where the stirrup's cover ends.
	edge := s.t.Cover.Add(radius)
	left, right := s.p.Brief.Section.Overhangs(face)
	r.reach = beyond
	for _, over := range [2]units.Length{left, right} {
		if !over.IsZero() {
			r.sides++
			r.reach = r.reach.Min(over.Sub(edge))
		}
	}
	r.least = size.Diameter.Add(s.p.Code.Gaps(s.p.Problem).InLayer.Least.Max(size.Diameter.Scale(s.p.Code.Gaps(s.p.Problem).InLayer.Diameters)))
	if !radius.Less(r.reach) {
		return flangeRoom{}
	}
	inset := s.t.Cover.Add(tie.Diameter).Add(radius)
	if bend, err := tie.Bend(bars.Stirrup); err == nil && !s.p.Brief.Readings.TuckedCorner {
		inset = s.t.Cover.Add(tie.Diameter).Add(radius.Max(bend.Inside.Scale(0.5)))
	}
	r.reach, r.web = r.reach.Add(inset), web.Sub(inset.Scale(2))
	r.least = r.least.Max(inset.Add(radius)) // the first stands clear of the web
	return r
}

// bounds are the most bars of a size in a layer, and the least tension steel
// that the code could accept at the depth of a single layer of them.
func (s *search) bounds(sense Sense, tie bars.Size, size *bars.Size) (most int, least units.Area, ok bool) {
	s.t.enclose(tie, *size)
	cage := s.t.cage()
	most, err := cage.MostInLayer(*size, s.p.Code.Gaps(s.p.Problem).InLayer)
	if err != nil {
		return 0, least, false
	}
	least, ok = s.p.Code.LeastTension(s.p.Problem, sense, s.singleLayerDepth(tie, *size))
	return most, least, ok
}

// singleLayerDepth is the effective depth of one layer of a size resting on
// the stirrup, with the cover of the trial.
func (s *search) singleLayerDepth(tie, size bars.Size) units.Length {
	_, rests, _ := size.Extent()
	return s.p.Brief.Section.Depth.Sub(s.t.Cover).Sub(tie.Diameter).Sub(rests)
}
