package beam

import (
	"context"
	"math"
	"slices"

	"soffit.example/bars"
	"soffit.example/units"
)

// search looks for the best layouts of one problem. Its space is declared:
//
//   - longitudinal sets of one size (two neighbouring ones if asked), layers
//     filled from the face, on each face;
//   - where the code spreads the tension steel of a flange beyond the web, one
//     to mostBeside bars a side beside it, of the same size (or of the smaller
//     neighbour if asked), evenly over the room there is: of as many bars, the
//     set that leaves the least of widest distances;
//   - where bundles are allowed, sets of bundles of one size and number too, but
//     none beside the web;
//   - on a face that is never in tension, two to MaxLegs bars of the smallest
//     size that is not smaller than the stirrup, to hold its legs; under a
//     torque that must be designed for, one layer of any size and number;
//   - stirrups of each allowed size and 2 to MaxLegs legs, at multiples of
//     the spacing step up to the code's widest, in one zone from face to face
//     or in three, the outer ones at the widest spacing that would pass
//     throughout and each at most 45 % of the clear length (of a cantilever,
//     one of at most 90 %); more legs only while they buy a wider spacing;
//   - compression steel only for a face that no tension steel alone can
//     satisfy: of each size the fewest bars, in one layer, that do.
//
// Within that space it is exhaustive: what it skips could not be ranked among
// the layouts kept, or is below the code's own bound on tension steel. It gives
// a stirrup size up early only where nothing passes with the first pairs tried,
// the lightest, nor with the heaviest bars that pass on their own faces: the
// section is then too small for the shear or the torque, whatever the bars.
type search struct {
	p      *prepared
	prefer Preference
	keep   int // layouts to keep, best first

	main, ties []bars.Size
	bundles    []bars.Size // of the sizes of main, as units

	t       Trial
	laid    [Top + 1]laid
	checks  []Check // scratch
	failed  []Check // scratch
	layers  []bars.Layer
	groups  [2 * MaxLayers]bars.Group
	flange  [1]flangeRow
	zones   []Zone // scratch of the zone search
	best    []Zone // scratch, the lightest zones of a pair so far
	hint    int    // spacing steps that the last bars needed throughout
	widest  int    // spacing steps that the code could accept for the current bars
	member  bool   // spans are given, so zones have extents
	from    units.Length
	to      units.Length
	kept    []found
	first   Layout // of the first of kept, with the side bars it needs
	whole   bool   // first passes as a whole member too
	rejects rejectLog
	logs    bool          // log every arrangement of stirrups that fails
	near    [3]near       // by face, and at 0 for whole pairs
	alone   [Top + 1]bool // faces at which some set passes by itself
}

// laid is what lies at a face of the trial. The zero value is not known.
type laid struct {
	set           *barSet
	inCompression bool
	stirrup       bars.Size
	cover         units.Length
}

// found is a layout that passes.
type found struct {
	key         [2]float64
	bottom, top barSet
	inCompress  Face // zero: none
	stirrup     bars.Size
	zones       []Zone
	mass        float64 // kg, of bars and stirrups; per metre with demands
	stirrupMass float64
}

// near remembers what came closest, so that a beam that cannot be satisfied
// still gets a layout to look at: for a face the set alone, for a pair all
// of it.
type near struct {
	ok    bool
	worst float64 // utilization
	set   barSet
	pair  found
}

// newSearch readies a search that keeps so many layouts.
func newSearch(p *prepared, keep int) *search {
	b := &p.Brief
	s := &search{p: p, prefer: b.Preferences.Prefer, keep: keep, member: len(b.Spans) > 0}
	s.t.Problem = p.Problem
	for _, n := range b.Preferences.Bars {
		if size, err := p.Catalog.Size(n); err == nil && p.Code.Allows(bars.Main, size) {
			s.main = append(s.main, size)
		}
	}
	for _, n := range b.Preferences.Stirrups {
		if size, err := p.Catalog.Size(n); err == nil && p.Code.Allows(bars.Stirrup, size) {
			s.ties = append(s.ties, size)
		}
	}
	byArea := func(a, b bars.Size) int { return a.Area.Compare(b.Area) }
	slices.SortFunc(s.main, byArea)
	for _, size := range s.main {
		for n := 2; n <= b.Preferences.Bundles; n++ {
			if unit, err := bars.Bundle(size, n); err == nil && p.Code.Allows(bars.Main, unit) {
				s.bundles = append(s.bundles, unit)
			}
		}
	}
	slices.SortFunc(s.ties, byArea)
	if s.member {
		s.from, s.to = p.Faces(1)
	}
	return s
}

// run searches every stirrup size, singly reinforced first.
func (s *search) run(ctx context.Context) error {
	if len(s.main) == 0 {
		return nil
	}
	for _, tie := range s.ties {
		bottoms, tops := s.sets(Bottom, tie), s.sets(Top, tie)
		if err := s.pairs(ctx, tie, bottoms, tops); err != nil {
			return err
		}
		if s.done() {
			return nil
		}
	}
	if len(s.kept) > 0 {
		return nil
	}
	for _, face := range [2]Face{Bottom, Top} {
		if s.alone[face] {
			continue // what fails is not the steel of this face
		}
		hopeless := make(map[barPlan]bool)
		for _, tie := range s.ties {
			if err := s.compressed(ctx, tie, face, hopeless); err != nil {
				return err
			}
		}
	}
	return nil
}

// done reports whether a layout is found that will do.
func (s *search) done() bool { return s.p.any && len(s.kept) > 0 }

func (s *search) bent(sense Sense) bool { return s.p.bent(sense) }

// tensionSense is the sense of bending that puts a face in tension.
func tensionSense(f Face) Sense {
	if f == Top {
		return Negative
	}
	return Positive
}

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

// judge puts the current trial to groups of checks and sifts them.
func (s *search) judge(face Face, groups ...Group) (ok bool) {
	s.checks, s.failed = s.checks[:0], s.failed[:0]
	if groups[0] != Shearing { // stirrups that only move are seen to once, in eachStirrup
		s.checks = s.t.appendGeometry(s.checks)
	}
	for _, g := range groups {
		s.checks = s.p.Code.Judge(s.checks, g, &s.t)
	}
	return s.sift(face)
}

// sift adds the checks of a judgement that fail to s.failed and reports whether
// there are none; with a face given, only that face's and those of no face.
func (s *search) sift(face Face) (ok bool) {
	for i := range s.checks {
		c := &s.checks[i]
		if c.Outcome == Fail && (face == 0 || c.Face == 0 || c.Face == face) {
			s.failed = append(s.failed, *c)
		}
	}
	return len(s.failed) == 0
}

// put lays a set at a face of the trial, unless it lies there already.
func (s *search) put(face Face, b *barSet, inCompression bool) bool {
	now := laid{set: b, inCompression: inCompression, stirrup: s.t.Stirrup, cover: s.t.Cover}
	if s.laid[face] == now {
		return true
	}
	s.layers = s.layers[:0]
	beside := s.flange[:0]
	if b != nil {
		s.layers = b.appendLayers(s.layers, s.groups[:])
		if b.flange.count > 0 {
			beside = append(beside, b.flange)
		}
	}
	s.laid[face] = now
	if s.t.lay(face, s.layers, beside, inCompression) != nil {
		s.laid[face] = laid{}
		return false
	}
	return true
}

// layPair lays the sets of both faces inside a stirrup size, without zones yet.
func (s *search) layPair(tie bars.Size, bottom, top *barSet, inCompression Face) bool {
	s.t.enclose(tie, larger(bottom.largest(), top.largest()))
	s.t.Zones, s.t.ZoneBar = nil, nil
	return s.put(Bottom, bottom, inCompression == Bottom) && s.put(Top, top, inCompression == Top)
}

// accepts judges a set on its own face, once.
func (s *search) accepts(face Face, tie bars.Size, b *barSet) bool {
	if b.judged {
		return b.passes
	}
	b.judged = true
	s.t.enclose(tie, b.largest())
	b.cover = s.t.Cover
	s.t.Zones, s.t.ZoneBar = nil, nil
	if !s.put(face, b, false) || !s.put(face.Opposite(), nil, false) {
		return false
	}
	b.passes = s.judge(face, Fitting, Bending)
	s.alone[face] = s.alone[face] || b.passes
	if worst := s.worst(); !s.near[face].ok || worst < s.near[face].worst {
		s.near[face] = near{ok: true, worst: worst, set: *b}
	}
	if !b.passes {
		s.reject(s.arrangement(face, b, tie.Name))
	}
	return b.passes
}

// arrangement describes a set at a face inside a stirrup size.
func (s *search) arrangement(face Face, b *barSet, tie string) Arrangement {
	a := Arrangement{Face: face, Depth: s.p.Brief.Section.Depth, With: tie}
	a.Layers, a.Beside = b.names()
	return a
}

// worst is the largest utilization among the failed checks of the last
// judgement; zero if none failed.
func (s *search) worst() float64 {
	w := 0.0
	for i := range s.failed {
		w = max(w, s.failed[i].Utilization)
	}
	return w
}

// pairs joins bottom and top sets and finds stirrups for each pair that could
// still be kept.
func (s *search) pairs(ctx context.Context, tie bars.Size, bottoms, tops []barSet) error {
	s.t.enclose(tie, s.main[len(s.main)-1]) // the greatest cover, and so the shortest stirrups
	lightest := s.leastStirrups(tie, s.p.Brief.Section.Depth)
	patience := hopelessPairs
	for i := range bottoms {
		if err := ctx.Err(); err != nil {
			return err
		}
		b := &bottoms[i]
		for j := range tops {
			t := &tops[j]
			if !s.promising(b, t, lightest) {
				continue
			}
			if !s.accepts(Top, tie, t) {
				continue
			}
			if !s.accepts(Bottom, tie, b) {
				break
			}
			if s.shear(tie, b, t, 0) {
				patience = math.MaxInt
			}
			if s.done() {
				return nil
			}
			if patience--; patience == 0 && !s.heaviest(tie, bottoms, tops) {
				return nil
			}
		}
	}
	return nil
}

// hopelessPairs is how many pairs are tried before those of the most steel
// must show that stirrups can do at all.
const hopelessPairs = 24

// heaviest reports whether stirrups do for the heaviest sets that pass on their
// own faces, with which the concrete bears the most shear.
func (s *search) heaviest(tie bars.Size, bottoms, tops []barSet) bool {
	b, t := s.heaviestAccepted(Bottom, tie, bottoms), s.heaviestAccepted(Top, tie, tops)
	return b == nil || t == nil || s.shear(tie, b, t, 0)
}

func (s *search) heaviestAccepted(face Face, tie bars.Size, sets []barSet) *barSet {
	for i := len(sets) - 1; i >= 0; i-- {
		if s.accepts(face, tie, &sets[i]) {
			return &sets[i]
		}
	}
	return nil
}

// compressed looks for tension sets at a face that pass once bars on the
// other face are relied on in compression: of each size the fewest that do,
// or more where the stirrups have legs to hold.
//
// Sets that are hopeless inside one stirrup are left out inside the thicker
// ones that follow, which only move bars away from the face.
func (s *search) compressed(ctx context.Context, tie bars.Size, face Face, hopeless map[barPlan]bool) error {
	sense := tensionSense(face)
	if !s.bent(sense) {
		return nil
	}
	var sets []barSet
	others := make([][]barSet, len(s.main)) // by size, fewest bars first
	for i := range s.main {
		most, _, _ := s.bounds(sense, tie, &s.main[i])
		uniform := uniformSets(nil, &s.main[i], 2, most, s.p.Brief.Preferences.MaxLayers)
		sets = append(sets, s.flangeRoom(face, tie, &s.main[i]).withFlange(uniform, &s.main[i], units.Area{}, s.p.Brief.Preferences.SpacingBy)...)
		others[i] = uniformSets(nil, &s.main[i], 2, most, 1)
	}
	sortSets(sets)
	s.t.enclose(tie, s.main[len(s.main)-1])
	lightest := s.leastStirrups(tie, s.p.Brief.Section.Depth)
	for i := range sets {
		if err := ctx.Err(); err != nil {
			return err
		}
		b := &sets[i]
		if hopeless[b.barPlan] || !s.promising(b, &barSet{}, lightest) {
			continue
		}
		if !s.helped(tie, face, b, others) {
			hopeless[b.barPlan] = true
			continue
		}
		for _, of := range others {
			s.compress(tie, face, b, of, lightest)
		}
		if s.done() {
			return nil
		}
	}
	return nil
}

// farOff is the utilization beyond which the most steel of another size, much
// the same in amount and in depth, would not help either.
const farOff = 1.5

// helped reports whether the most steel of one of the largest sizes in
// compression makes a tension set pass in its own sense. Less would not.
func (s *search) helped(tie bars.Size, face Face, b *barSet, others [][]barSet) bool {
	tried := 0
	for i := len(others) - 1; i >= 0 && tried < 3; i-- {
		n := len(others[i])
		if n == 0 {
			continue
		}
		o := &others[i][n-1]
		if s.presses(tie, face, b, o) && s.judge(face, Bending) {
			return true
		}
		if tried++; tried == 1 {
			s.rejectPressed(tie, face, b, o)
			if s.worst() > farOff {
				return false
			}
		}
	}
	return false
}

// rejectPressed logs a tension set with compression steel by the checks that
// have just failed.
func (s *search) rejectPressed(tie bars.Size, face Face, b, other *barSet) {
	a := s.arrangement(face, b, tie.Name)
	layers, _ := other.names()
	a.Pressed = layers[0]
	s.reject(a)
}

// compress completes a tension set with bars of one size in compression. In
// the sense that they help, more of them never fail where fewer pass; what they
// do to the other sense and to the fit is judged count by count.
func (s *search) compress(tie bars.Size, face Face, b *barSet, of []barSet, lightest float64) {
	n := len(of)
	helps := func(o *barSet) bool { return s.presses(tie, face, b, o) && s.judge(face, Bending) }
	if n == 0 || !s.promising(b, &of[0], lightest) || !helps(&of[n-1]) {
		return
	}
	first := n - 1 - last(0, n-1, func(fewer int) bool { return helps(&of[n-1-fewer]) })
	for i := first; i < n; i++ {
		o := &of[i]
		if !s.promising(b, o, lightest) {
			return
		}
		if !s.relied(tie, face, b, o) {
			s.rejectPressed(tie, face, b, o)
			continue
		}
		bottom, top := b, o
		if face == Top {
			bottom, top = o, b
		}
		if s.shear(tie, bottom, top, face.Opposite()) || o.count >= s.p.Brief.Preferences.MaxLegs {
			return
		}
	}
}

// presses lays a tension set with compression steel opposite.
func (s *search) presses(tie bars.Size, face Face, b, other *barSet) bool {
	bottom, top := b, other
	if face == Top {
		bottom, top = other, b
	}
	return s.layPair(tie, bottom, top, face.Opposite())
}

// relied judges a tension set with compression steel opposite.
func (s *search) relied(tie bars.Size, face Face, b, other *barSet) bool {
	return s.presses(tie, face, b, other) && s.judge(0, Bending, Fitting)
}

func larger(a, b bars.Size) bars.Size {
	if a.Diameter.Less(b.Diameter) {
		return b
	}
	return a
}

// shear completes a pair with stirrups and keeps what passes. Where bars of
// one face ask for cover that moves the other's, the pair is judged again as
// a whole first.
// It reports whether any stirrups do for the pair.
func (s *search) shear(tie bars.Size, bottom, top *barSet, inCompression Face) (ok bool) {
	if !s.layPair(tie, bottom, top, inCompression) {
		return false
	}
	if moved := s.t.Cover != bottom.cover || s.t.Cover != top.cover; moved && inCompression == 0 && !s.judge(0, Fitting, Bending) {
		return false
	}
	if !s.promising(bottom, top, s.leastStirrups(tie, s.tensionDepth())) {
		return true
	}
	long := s.longitudinal(bottom, top)
	return s.eachStirrup(tie, func(mass float64) bool { return s.promising(bottom, top, mass) }, func(zones []Zone, stirrups float64) {
		f := found{
			bottom: *bottom, top: *top, inCompress: inCompression, stirrup: tie,
			mass: long + stirrups, stirrupMass: stirrups,
		}
		f.key = s.key(bottom, top, f.mass, len(zones))
		if s.ranks(f.key) {
			f.zones = slices.Clone(zones)
			s.keepBest(f)
		}
	})
}

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

// rejectLog keeps every arrangement that failed with all the checks it
// failed, in few allocations.
type rejectLog struct {
	list []Rejected
	slab []Check
}

// reject logs an arrangement with the checks of the last judgement.
func (s *search) reject(a Arrangement) {
	l := &s.rejects
	if cap(l.slab)-len(l.slab) < len(s.failed) {
		l.slab = make([]Check, 0, max(64, len(s.failed)))
	}
	start := len(l.slab)
	l.slab = append(l.slab, s.failed...)
	l.list = append(l.list, Rejected{Arrangement: a, Failed: l.slab[start:len(l.slab):len(l.slab)]})
}
