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
	s.t.enclose(tie, bottom.largest(), top.largest())
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
