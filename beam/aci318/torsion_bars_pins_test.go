package aci318

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// The least and the greatest magnitude of a torque that is linear between two
// ends: nothing where it passes zero.
func TestTorqueSpan(t *testing.T) {
	for _, tc := range []struct{ from, to, least, most float64 }{
		{3, 2, 2, 3}, {2, 3, 2, 3}, {-3, -2, 2, 3}, {-2, -3, 2, 3},
		{-3, 2, 0, 3}, {3, -2, 0, 3}, {-2, 3, 0, 3}, {2, -3, 0, 3},
		{0, 3, 0, 3}, {-3, 0, 0, 3}, {0, 0, 0, 0},
		{0.5, 0.25, 0.25, 0.5}, {-0.5, -0.25, 0.25, 0.5}, {-0.5, 0.25, 0, 0.5}, {0.5, -0.25, 0, 0.5},
	} {
		least, most := torqueEnds{tc.from, tc.to}.span()
		require.Equal(t, [2]float64{tc.least, tc.most}, [2]float64{least, most}, "%g to %g", tc.from, tc.to)
	}
}

// ownFaces are the faces of twistedBrief, under no torque yet.
func ownFaces(t testing.TB) torsionFaces {
	t.Helper()
	_, trial := twistedTrial(t, ACI31814(), nil)
	return us14.newTorsionFaces(trial)
}

// 22.7.3: what compatibility imposes counts up to φTcr, what equilibrium needs
// counts whole, and nothing is neglected where one of them reaches φTth
// (9.5.4.1). Torques in parts of φTth, of which φTcr is four (22.7.4.1,
// 22.7.5.1).
func TestTorquesOfAPart(t *testing.T) {
	threshold := 0.75 * math.Sqrt(4000) * 448 * 448 / 88
	for _, tc := range []struct {
		name        string
		all, own    torqueEnds
		least, most float64 // none where neglected
	}{
		{"below the threshold", torqueEnds{0.5, 0.9}, torqueEnds{0.5, 0.9}, 0, 0},
		{"at the threshold", torqueEnds{0.2, 1}, torqueEnds{0.2, 1}, 1, 1},
		{"equilibrium", torqueEnds{3, 2}, torqueEnds{3, 2}, 2, 3},
		{"equilibrium beyond cracking", torqueEnds{6, 5}, torqueEnds{6, 5}, 5, 6},
		{"from below the threshold", torqueEnds{0.2, 2}, torqueEnds{0.2, 2}, 1, 2},
		{"compatibility below cracking", torqueEnds{3, 2}, torqueEnds{}, 2, 3},
		{"compatibility beyond cracking", torqueEnds{6, 5}, torqueEnds{}, 4, 4},
		{"compatibility that passes zero", torqueEnds{6, -2}, torqueEnds{}, 1, 4},
		{"equilibrium that passes zero, opposed", torqueEnds{2, 3}, torqueEnds{5, -6}, 2, 6},
		{"equilibrium that is opposed", torqueEnds{2, 3}, torqueEnds{-5, -6}, 2, 6},
		{"opposed until it is neglected", torqueEnds{0.5, 0.5}, torqueEnds{-5, -5}, 1, 5},
	} {
		t.Run(tc.name, func(t *testing.T) {
			f := ownFaces(t)
			scale := func(q torqueEnds) torqueEnds { return torqueEnds{q.from * threshold, q.to * threshold} }
			f.bounded(&beam.Action{}, 0, 0, scale(tc.all), scale(tc.own))
			require.Equal(t, tc.most > 0, f.side.found)
			require.InDelta(t, tc.least*threshold, f.side.need.low, 1e-6)
			require.InDelta(t, tc.most*threshold, f.side.need.most, 1e-6)
		})
	}
}

// The sides keep the part that pulls most, be it by 22.7.6.1 or by the least
// steel of 9.6.4.3, and of equal ones the first.
func TestSidesKeepTheGreatestPull(t *testing.T) {
	need := func(name string, strength, least float64) *faceNeed {
		return &faceNeed{action: beam.Action{Combination: name}, strength: strength, least: least}
	}
	var w worstSide
	for _, tc := range []struct {
		next *faceNeed
		kept string
	}{
		{need("A", 5, 3), "A"}, {need("same", 5, 1), "A"}, {need("less", 4, 4.5), "A"}, {need("by the least", 2, 6), "by the least"},
		{need("both near", 5.5, 5.5), "by the least"}, {need("by strength", 7, 1), "by strength"},
	} {
		w.take(tc.next)
		require.Equal(t, tc.kept, w.need.action.Combination, tc.next.action.Combination)
	}
}

// What one part of the beam asks of the bottom face of twistedBrief: x1 + y1/3 =
// 20.667 in. of ph = 74 in. of the pull of torsion, beside bending at φ = 0.9
// (9.5.4.3), axial tension at 0.9 fy, and relief over 0.9 d (9.5.4.5).
func TestNeedOfAFace(t *testing.T) {
	const fy, part = 60000.0, (12.5 + 24.5/3) / 74
	const dTop = 28 - 1.5 - 0.5 - 0.375
	steel := func(moment float64) float64 {
		rn := moment / (0.9 * 16 * 25.5 * 25.5)
		return 0.85 * 4000 / fy * (1 - math.Sqrt(1-2*rn/(0.85*4000))) * 16 * 25.5
	}
	for _, tc := range []struct {
		name             string
		n                faceNeed
		need, inside     float64
		pulled, bending  float64
		relieved, broken bool
	}{
		{name: "neither moment nor force", n: faceNeed{strength: 9e4, least: 3e4}, need: 1.5 * part, inside: 1.5 * part},
		{name: "by the least steel", n: faceNeed{strength: 3e4, least: 9e4}, need: 1.5 * part, inside: 1.5 * part},
		{name: "pressed", n: faceNeed{strength: 9e4, moment: -1e5}, need: 1.5*part - 1e5/(0.9*dTop*fy), inside: 1.5*part - 1e5/(0.9*dTop*fy), relieved: true},
		{name: "pressed down to the least", n: faceNeed{strength: 9e4, least: 6e4, moment: -9e5}, need: part, inside: part, relieved: true},
		{name: "pressed and pulled", n: faceNeed{strength: 9e4, least: 6e4, moment: -9e5, axial: -108000},
			need: 1.5*part + 2 - 9e5/(0.9*dTop*fy), inside: part, pulled: 2, relieved: true},
		{name: "pulled alone", n: faceNeed{strength: 9e4, axial: -54000}, need: 1.5*part + 1, inside: 1.5 * part, pulled: 1},
		{name: "a little compression", n: faceNeed{strength: 9e4, axial: 0.5}, need: 1.5 * part, inside: 1.5 * part},
		{name: "bent", n: faceNeed{strength: 9e4, moment: 1.2e6}, need: 1.5*part + steel(1.2e6), inside: 1.5 * part, bending: steel(1.2e6)},
		{name: "bent a little", n: faceNeed{strength: 9e4, moment: 0.5}, need: 1.5*part + steel(0.5), inside: 1.5 * part, bending: 0.5 / (0.9 * fy * 25.5)},
		{name: "bent beyond what steel carries", n: faceNeed{strength: 9e4, moment: 1e8}, broken: true},
		{name: "without a cage", n: faceNeed{broken: noteNoCage}, broken: true},
	} {
		t.Run(tc.name, func(t *testing.T) {
			f := ownFaces(t)
			face := &f.faces[0]
			face.take(&f, tc.n)
			require.True(t, face.found)
			w := &face.worst
			if tc.broken {
				require.NotEmpty(t, w.broken)
				require.Equal(t, beam.NoCapacity, face.worstRatio)
				return
			}
			require.Empty(t, w.broken)
			require.InEpsilon(t, tc.need, w.need, 1e-9)
			require.InEpsilon(t, tc.inside, w.inside, 1e-9)
			require.InDelta(t, tc.pulled, w.pulled, 1e-12)
			require.InDelta(t, tc.bending, w.bending, 1e-9*max(tc.bending, 1e-4))
			require.Equal(t, tc.relieved, w.relief > 0)
			require.InEpsilon(t, max(tc.need/3.16, tc.inside/3.16), face.worstRatio, 1e-9)
		})
	}

	f := ownFaces(t)
	face := &f.faces[0]
	face.area = 0
	face.take(&f, faceNeed{strength: 9e4, moment: 1e5})
	require.InEpsilon(t, 1.5*part, face.worst.need, 1e-12, "of bars that are not there")
	require.Equal(t, beam.NoCapacity, face.worstRatio)

	f = ownFaces(t)
	face = &f.faces[0]
	face.beyond = true
	face.take(&f, faceNeed{strength: 9e4, moment: 1e5})
	require.Equal(t, noteBeyondBending, face.worst.broken)
	require.Equal(t, beam.NoCapacity, face.worstRatio)
}

// A face keeps the worst of its parts, whatever of them comes first: also where
// the bound by the greatest moment would pass over one.
func TestAFaceKeepsItsWorstPart(t *testing.T) {
	part := func(name string, strength, moment, axial float64) faceNeed {
		return faceNeed{action: beam.Action{Combination: name}, strength: strength, moment: moment, axial: axial}
	}
	for _, tc := range []struct {
		name  string
		parts []faceNeed
		want  string
	}{
		{"a greater moment", []faceNeed{part("A", 9e4, 6e5, 0), part("B", 9e4, 1.2e6, 0)}, "B"},
		{"a lesser moment", []faceNeed{part("A", 9e4, 1.2e6, 0), part("B", 9e4, 6e5, 0)}, "A"},
		{"the same", []faceNeed{part("A", 9e4, 1.2e6, 0), part("B", 9e4, 1.2e6, 0)}, "A"},
		{"a lesser moment with more torque", []faceNeed{part("A", 9e4, 1.2e6, 0), part("B", 36e4, 1.0e6, 0)}, "B"},
		{"a lesser moment with tension", []faceNeed{part("A", 9e4, 1.2e6, 0), part("B", 9e4, 1.1e6, -60000)}, "B"},
		{"in compression, then bent", []faceNeed{part("A", 9e4, -1e5, 0), part("B", 9e4, 1e5, 0)}, "B"},
		{"bent, then in compression", []faceNeed{part("A", 9e4, 1e5, 0), part("B", 9e4, -1e5, 0)}, "A"},
	} {
		f := ownFaces(t)
		for _, p := range tc.parts {
			f.faces[0].take(&f, p)
		}
		require.Equal(t, tc.want, f.faces[0].worst.action.Combination, tc.name)
	}
}

// The faces of twistedBrief are readied by its greatest moment, and by d of the
// opposite bars; where those are not laid, by no more than the stirrups leave.
func TestFacesAreReadied(t *testing.T) {
	f := ownFaces(t)
	require.InEpsilon(t, 28-1.5-0.5-0.375, f.faces[0].lever, 1e-12)
	require.InEpsilon(t, 25.5, f.faces[1].lever, 1e-12)
	require.InEpsilon(t, 1.2e6, f.faces[0].most, 1e-12)
	require.Zero(t, f.faces[1].most)
	require.False(t, f.faces[0].beyond)
	_, trial := twistedTrial(t, ACI31814(), func(_ *beam.Brief, l *beam.Layout) { l.Longitudinal = l.Longitudinal[:1] })
	f = us14.newTorsionFaces(trial)
	require.InEpsilon(t, 28-1.5-0.5, f.faces[0].lever, 1e-12)
	_, trial = twistedTrial(t, ACI31814(), func(b *beam.Brief, _ *beam.Layout) { b.Demands[0].Moment = units.KipFoot.Of(900) })
	f = us14.newTorsionFaces(trial)
	require.True(t, f.faces[0].beyond)
	require.False(t, f.faces[1].beyond)
	_, trial = twistedTrial(t, ACI31814(), func(_ *beam.Brief, l *beam.Layout) { l.Longitudinal[0] = bottom(1, "#11") })
	f = us14.newTorsionFaces(trial)
	require.InEpsilon(t, 1.2e6, f.faces[0].most, 1e-12, "one bar is enough to measure by")
}

// A face, or a side, of which no part of the beam asks anything is not judged;
// one without bars inside the stirrups fails whatever is asked (9.7.5.1).
func TestFacesOfWhichNothingIsAsked(t *testing.T) {
	f := ownFaces(t)
	c := f.check(0)
	require.Equal(t, beam.NotApplicable, c.Outcome)
	require.Equal(t, noteNeglected, c.Reason)
	f.faces[0].found, f.faces[0].web = true, 0
	c = f.check(0)
	require.Equal(t, beam.Fail, c.Outcome)
	require.Equal(t, "no bars lie at this face inside the stirrups", c.Reason)

	_, trial := twistedTrial(t, ACI31814(), func(b *beam.Brief, _ *beam.Layout) { b.Demands[0].Torque = units.KipFoot.Of(5) })
	trial.Twisted = true
	c = only(t, us14.appendTorsionSides(nil, trial), "torsion.longitudinal.side")
	require.Equal(t, beam.NotApplicable, c.Outcome)
	require.Equal(t, noteNeglected, c.Reason)
	_, trial = twistedTrial(t, ACI31814(), func(_ *beam.Brief, l *beam.Layout) { l.Longitudinal[1] = top(1, "#9") })
	require.Equal(t, "a longitudinal bar lies in each corner of the closed stirrups", judgeCorners(trial).Reason)
}

// One bar a side counts with its own grade too: two thirds of Al by y1/ph.
func TestOneSideBarOfItsOwnGrade(t *testing.T) {
	r := twisted(t, ACI31814(), func(_ *beam.Brief, l *beam.Layout) { l.Longitudinal[2].Count, l.Longitudinal[2].Yield = 1, psi(40000) })
	require.InEpsilon(t, ownLong(40000)*24.5*2/3/74, valueIn(t, find1(t, r, "torsion.longitudinal.side").Demand, "in2"), 1e-9)
}

// Layers that come to both legs are as far apart as their bars; a single bar
// between the legs is none of the bars along a side (9.7.5.1).
func TestLayersAlongASide(t *testing.T) {
	_, trial := twistedTrial(t, ACI31814(), nil)
	layer := trial.Bottom.Fit.Layers[0]
	layers := append(trial.Bottom.Fit.Layers[:0:0], layer)
	for _, l := range []struct {
		at    float64
		count int
	}{{9, 2}, {20, 1}, {22, 2}} {
		layer.Centroid, layer.Count = in(l.at), l.count
		layers = append(layers, layer)
	}
	trial.Bottom.Fit.Layers = layers
	gap, found := widestAlongSide(trial)
	require.True(t, found)
	require.InEpsilon(t, 22-9, gap.In(units.Inch), 1e-9)
}

// A stretch of no length is its section, and a short one takes the greatest
// moment along it.
func TestShortStretches(t *testing.T) {
	_, trial := twistedTrial(t, ACI31814(), twistedSpan(40, 9))
	from, to := in(30), in(50)
	for _, end := range []units.Length{from, to} {
		f := us14.newTorsionFaces(trial)
		f.stretch(0, 1, from, end)
		require.True(t, f.side.found)
		require.InEpsilon(t, trial.Forces.Action(0, 1, end, false).Moment.In(units.PoundInch), f.faces[0].worst.moment, 1e-9)
	}
}

// Axial tension lowers φTth (22.7.4.1), so that a torque is no longer neglected
// and asks for bars: 7 kip-ft beside 60 kip.
func TestTensionMakesATorqueCount(t *testing.T) {
	_, trial := twistedTrial(t, ACI31814(), func(b *beam.Brief, _ *beam.Layout) {
		b.Demands[0].Axial, b.Demands[0].Torque = units.Kip.Of(-60), units.KipFoot.Of(7)
	})
	f := us14.newTorsionFaces(trial)
	f.follow()
	require.True(t, f.faces[0].found && f.faces[1].found && f.side.found)
}
