package aci318

import (
	"context"
	"math"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// twistedBrief is ownSection under 45 kip-ft of torque with 30 kip of shear and
// 100 kip-ft of moment, and a layout that carries them.
func twistedBrief() (beam.Brief, beam.Layout) {
	b := beam.Brief{
		Section: ownSection(), Concrete: beam.Concrete{Strength: psi(4000)},
		Reinforcement: beam.Reinforcement{Catalog: "astm-inch", Yield: psi(60000)},
		Exposure:      beam.Interior, Cover: in(1.5),
		Demands: []beam.Demand{{Name: "A", Moment: units.KipFoot.Of(100), Shear: units.Kip.Of(30), Torque: units.KipFoot.Of(45)}},
	}
	return b, beam.Layout{
		Longitudinal: []beam.Row{bottom(4, "#8"), top(3, "#6"), {Mark: "W", Bar: "#5", Count: 2, Face: beam.Side, Spacing: in(7.65)}},
		Transverse:   []beam.Zone{{Mark: "S", Bar: "#4", Legs: 2, Spacing: in(6), Form: "closed"}},
	}
}

// twisted judges that layout, edited.
func twisted(t testing.TB, c Code, edit func(*beam.Brief, *beam.Layout)) *beam.Result {
	t.Helper()
	r, _ := twistedTrial(t, c, edit)
	return r
}

func twistedTrial(t testing.TB, c Code, edit func(*beam.Brief, *beam.Layout)) (*beam.Result, *beam.Trial) {
	t.Helper()
	b, l := twistedBrief()
	if edit != nil {
		edit(&b, &l)
	}
	var trial *beam.Trial
	r, err := beam.CheckLayout(context.Background(), spy{c, &trial}, b, l)
	require.NoError(t, err)
	require.Empty(t, r.Refusals)
	return r, trial
}

// torsionFailures are the ids of the checks on torsion that fail.
func torsionFailures(r *beam.Result) (ids []string) {
	for i := range r.Checks {
		if c := &r.Checks[i]; c.Outcome == beam.Fail && strings.HasPrefix(c.ID, "torsion.") {
			ids = append(ids, c.ID)
		}
	}
	return ids
}

// The longitudinal steel of each face is that of bending and of torsion, spread
// evenly round the stirrup; on the side in compression the moment relieves it,
// but not below the least (9.5.4.3, 9.5.4.5). Own calculation: Al = 1.70564
// in2; sides of 24.5 in. in three parts; x1 + y1/3 = 20.667 in. of ph = 74 in.
func TestLongitudinalSteelFaceByFace(t *testing.T) {
	r := twisted(t, ACI31814(), nil)
	require.Equal(t, beam.Satisfied, r.Verdict, "%v", torsionFailures(r))
	const d, dTop = 25.5, 28 - 1.5 - 0.5 - 0.375
	al := ownLong(60000)
	share := al * (12.5 + 24.5/3) / 74
	rn := 100 * 12000 / (0.9 * 16 * d * d)
	as := 0.85 * 4000 / 60000 * (1 - math.Sqrt(1-2*rn/(0.85*4000))) * 16 * d
	c := find1(t, r, "torsion.longitudinal.bottom")
	require.InEpsilon(t, as+share, valueIn(t, c.Demand, "in2"), 1e-9)
	require.InEpsilon(t, 4*0.79, valueIn(t, c.Capacity, "in2"), 1e-12)
	require.Equal(t, beam.Bottom, c.Face)
	c = find1(t, r, "torsion.longitudinal.side")
	require.InEpsilon(t, al*24.5*2/3/74, valueIn(t, c.Demand, "in2"), 1e-9)
	require.InEpsilon(t, 2*0.31, valueIn(t, c.Capacity, "in2"), 1e-12)

	least := (5*math.Sqrt(4000)*448/60000 - al) * (12.5 + 24.5/3) / 74
	relief := 100 * 12000 / (0.9 * d * 60000.0)
	require.Less(t, share-relief, least)
	c = find1(t, r, "torsion.longitudinal.top")
	require.InEpsilon(t, least, valueIn(t, c.Demand, "in2"), 1e-9, "no less than the least steel")

	// A small moment relieves by itself; none relieves nothing; a hogging one
	// turns the faces round.
	r = twisted(t, ACI31814(), func(b *beam.Brief, _ *beam.Layout) { b.Demands[0].Moment = units.KipFoot.Of(10) })
	require.InEpsilon(t, share-0.1*relief, valueIn(t, find1(t, r, "torsion.longitudinal.top").Demand, "in2"), 1e-9)
	r = twisted(t, ACI31814(), func(b *beam.Brief, _ *beam.Layout) { b.Demands[0].Moment = units.Moment{} })
	require.InEpsilon(t, share, valueIn(t, find1(t, r, "torsion.longitudinal.top").Demand, "in2"), 1e-9)
	require.InEpsilon(t, share, valueIn(t, find1(t, r, "torsion.longitudinal.bottom").Demand, "in2"), 1e-9)
	r = twisted(t, ACI31814(), func(b *beam.Brief, _ *beam.Layout) { b.Demands[0].Moment = units.KipFoot.Of(-10) })
	require.InEpsilon(t, share-10*12000/(0.9*dTop*60000), valueIn(t, find1(t, r, "torsion.longitudinal.bottom").Demand, "in2"), 1e-9)
}

// Low sides need no bars of their own: 12 in. between corners, and just more.
func TestSidesWithoutBars(t *testing.T) {
	for _, tc := range []struct {
		height float64 // y1
		side   beam.Outcome
	}{{12, beam.NotApplicable}, {12.1, beam.Fail}} {
		r := twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) {
			b.Section.Depth = in(tc.height + 3.5)
			b.Demands[0].Torque, b.Demands[0].Moment = units.KipFoot.Of(12), units.KipFoot.Of(20)
			l.Longitudinal = l.Longitudinal[:2]
		})
		require.Equal(t, tc.side, find1(t, r, "torsion.longitudinal.side").Outcome, "%g", tc.height)
	}
}

// Each limit of detailing is met just so, and missed by a little.
func TestTorsionDetailing(t *testing.T) {
	side := func(l *beam.Layout) *beam.Row { return &l.Longitudinal[2] }
	for _, tc := range []struct {
		name string
		edit func(b *beam.Brief, l *beam.Layout)
		fail []string
	}{
		{"as drawn", nil, nil},
		// ph/8 = 9.25 in.
		{"stirrups at ph/8", func(b *beam.Brief, l *beam.Layout) {
			l.Transverse[0].Spacing = in(9.25)
			b.Demands[0].Torque = units.KipFoot.Of(30)
		}, nil},
		{"stirrups wider", func(b *beam.Brief, l *beam.Layout) {
			l.Transverse[0].Spacing = in(9.26)
			b.Demands[0].Torque = units.KipFoot.Of(30)
		}, []string{"torsion.spacing-along"}},
		{"open stirrups", func(_ *beam.Brief, l *beam.Layout) { l.Transverse[0].Form = "open" }, []string{"torsion.transverse", "torsion.closed", "torsion.minimum-stirrups"}},
		{"stirrups at 60 degrees", func(_ *beam.Brief, l *beam.Layout) { l.Transverse[0].Angle = 60 }, []string{"torsion.transverse", "torsion.closed", "torsion.minimum-stirrups"}},
		{"upright stirrups said to be so", func(_ *beam.Brief, l *beam.Layout) { l.Transverse[0].Angle = 90 }, nil},
		{"no stirrups", func(_ *beam.Brief, l *beam.Layout) { l.Transverse = nil }, []string{"torsion.transverse", "torsion.closed"}},
		{"no top bars", func(_ *beam.Brief, l *beam.Layout) { l.Longitudinal = append(l.Longitudinal[:1:1], *side(l)) },
			[]string{"torsion.longitudinal.top", "torsion.corners", "torsion.bar-diameter", "torsion.longitudinal-spacing"}},
		{"no bottom bars", func(b *beam.Brief, l *beam.Layout) {
			l.Longitudinal = l.Longitudinal[1:2]
			b.Demands[0].Moment = units.KipFoot.Of(-20)
		}, []string{"torsion.longitudinal.bottom", "torsion.corners", "torsion.bar-diameter", "torsion.longitudinal-spacing", "torsion.longitudinal.side"}},
		{"one top bar", func(_ *beam.Brief, l *beam.Layout) { l.Longitudinal[1] = top(1, "#9") }, []string{"torsion.corners"}},
		{"no side bars", func(_ *beam.Brief, l *beam.Layout) { l.Longitudinal = l.Longitudinal[:2] }, []string{"torsion.longitudinal.side", "torsion.longitudinal-spacing"}},
		{"side bars too thin for the side", func(_ *beam.Brief, l *beam.Layout) { side(l).Bar = "#3" }, []string{"torsion.longitudinal.side"}},
		{"twelve inches", func(_ *beam.Brief, l *beam.Layout) { side(l).Spacing = in(11.125) }, []string{}}, // 2.5, 13.625, 24.75; the top bars at 25.625
		{"more than twelve inches", func(_ *beam.Brief, l *beam.Layout) {
			side(l).Spacing = in(12.01)
			side(l).Count = 1
			side(l).Bar = "#9"
		}, []string{"torsion.longitudinal-spacing"}},
		// 0.042 × 9 = 0.378 in. of No. 3 bars.
		{"bars thinner than 0.042 s", func(b *beam.Brief, l *beam.Layout) {
			b.Demands[0].Torque, l.Transverse[0].Spacing, l.Longitudinal[1] = units.KipFoot.Of(20), in(9), top(6, "#3")
		}, []string{"torsion.bar-diameter"}},
		{"bars of 3/8 in.", func(b *beam.Brief, l *beam.Layout) {
			b.Demands[0].Torque, l.Transverse[0].Spacing, l.Longitudinal[1] = units.KipFoot.Of(20), in(8.9), top(6, "#3")
		}, nil},
		{"side bars thinner than 0.042 s", func(b *beam.Brief, l *beam.Layout) {
			b.Demands[0].Torque, l.Transverse[0].Spacing = units.KipFoot.Of(20), in(9)
			side(l).Bar, side(l).Count, side(l).Spacing = "#3", 4, in(4.6)
		}, []string{"torsion.bar-diameter"}},
		{"too little in the legs", func(_ *beam.Brief, l *beam.Layout) { l.Transverse[0].Bar = "#3"; l.Transverse[0].Spacing = in(6) }, []string{"torsion.transverse"}},
		{"too little section", func(b *beam.Brief, l *beam.Layout) {
			b.Demands[0].Torque = units.KipFoot.Of(90)
			l.Transverse[0].Bar, l.Transverse[0].Spacing = "#5", in(4)
			l.Longitudinal = []beam.Row{bottom(4, "#9"), top(4, "#9"), {Mark: "W", Bar: "#9", Count: 2, Face: beam.Side, Spacing: in(7.6)}}
		}, []string{"torsion.section"}},
	} {
		t.Run(tc.name, func(t *testing.T) {
			r := twisted(t, ACI31819(), tc.edit)
			require.ElementsMatch(t, tc.fail, torsionFailures(r))
			for i := range r.Checks {
				if c := &r.Checks[i]; strings.HasPrefix(c.ID, "torsion.") && len(c.Steps) > 0 {
					requireEvaluable(t, c)
				}
			}
			require.Equal(t, len(tc.fail) > 0, r.Verdict == beam.Unsatisfied && len(torsionFailures(r)) > 0)
		})
	}
}

// The least stirrups of 9.6.4.2 are asked for where shear alone would not.
func TestLeastStirrupsOfTorsion(t *testing.T) {
	at := func(spacing float64) *beam.Result {
		return twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) {
			b.Section = beam.Section{Shape: beam.Rectangular, Width: in(36), Depth: in(14)}
			b.Demands[0].Torque, b.Demands[0].Shear, b.Demands[0].Moment = units.KipFoot.Of(17), units.Kip.Of(5), units.KipFoot.Of(20)
			l.Transverse[0].Bar, l.Transverse[0].Spacing = "#3", in(spacing)
			l.Longitudinal = []beam.Row{bottom(6, "#7"), top(6, "#7")}
		})
	}
	// 50 × 36/60,000 = 0.03 in2/in, 0.22/0.03 = 7.333 in.
	require.Equal(t, beam.Pass, find1(t, at(7.3333), "torsion.minimum-stirrups").Outcome)
	r := at(7.34)
	require.Equal(t, beam.Fail, find1(t, r, "torsion.minimum-stirrups").Outcome)
	require.Equal(t, beam.NotApplicable, find1(t, r, "shear.minimum-stirrups").Outcome)
}

// θ from 30 to 60 degrees, the same in both formulas; outside it is a fault.
func TestAngleOfTheDiagonals(t *testing.T) {
	for _, angle := range []float64{30, 45, 60} {
		r := twisted(t, ACI31819(), func(b *beam.Brief, _ *beam.Layout) {
			b.Readings.TorsionAngle = angle
			b.Demands[0].Shear = units.Kip.Of(5)
		})
		cot := 1 / math.Tan(angle*math.Pi/180)
		at := 45 * 12000 / (2 * 0.75 * 260.3125 * 60000 * cot)
		require.InEpsilon(t, at, valueIn(t, find1(t, r, "torsion.transverse").Demand, "in2/in"), 1e-9)
		least := 5*math.Sqrt(4000)*448/60000 - at*74
		require.InEpsilon(t, max(at*74*cot*cot, least)*24.5*2/3/74, valueIn(t, find1(t, r, "torsion.longitudinal.side").Demand, "in2"), 1e-9)
	}
	for _, angle := range []float64{29.9, 60.1} {
		b, l := twistedBrief()
		b.Readings.TorsionAngle = angle
		_, err := beam.CheckLayout(context.Background(), ACI31819(), b, l)
		var input *beam.InputError
		require.ErrorAs(t, err, &input)
		require.Equal(t, "/torsion_angle", input.Faults[0].Path)
		require.Contains(t, input.Faults[0].Allowed, "30 to 60")
	}
}

// A torque below its threshold leaves all of torsion aside, whatever the bars.
func TestNeglectedTorque(t *testing.T) {
	r := twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) {
		b.Demands[0].Torque = units.KipFoot.Of(9) // φTth = 9.015 kip-ft
		l.Transverse[0].Form = "open"
		l.Longitudinal = l.Longitudinal[:2]
	})
	require.Equal(t, beam.Pass, find1(t, r, "torsion.threshold").Outcome)
	for i := range r.Checks {
		if c := &r.Checks[i]; strings.HasPrefix(c.ID, "torsion.") && c.ID != "torsion.threshold" {
			require.Equal(t, beam.NotApplicable, c.Outcome, c.ID)
			require.Equal(t, noteNeglected, c.Reason)
		}
	}
	r = twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) { b.Demands[0].Torque = units.KipFoot.Of(9.02) })
	require.Equal(t, beam.NotApplicable, find1(t, r, "torsion.threshold").Outcome)
	require.Equal(t, beam.Pass, find1(t, r, "torsion.section").Outcome)
}

// twistedSpan is the section over 24 ft with a dead torque in kip-ft at x ft,
// both ends held against twist, and closed stirrups over all of it.
func twistedSpan(torque, x float64) func(*beam.Brief, *beam.Layout) {
	return func(b *beam.Brief, l *beam.Layout) {
		b.Demands = nil
		b.Spans = []units.Length{units.Foot.Of(24)}
		b.Supports = []beam.Support{{Kind: statics.Pinned, Width: in(12)}, {Kind: statics.Roller, Width: in(12)}}
		b.Loads = []beam.Load{
			{Case: beam.Dead, Shape: beam.Uniform, Intensity: units.KipPerFoot.Of(0.5)},
			{Case: beam.Dead, Shape: beam.Torque, Moment: units.KipFoot.Of(torque), At: units.Foot.Of(x)},
		}
		l.Transverse = []beam.Zone{{Mark: "S", Span: 1, Bar: "#4", Legs: 2, Spacing: in(6), From: in(6), To: in(282), Form: "closed"}}
	}
}

// 9.7.6.3.2: stirrups of torsion go on bt + d beyond the place to which they
// are needed. 24 kip-ft of 1.4D at 6 ft: 18 to the left, 6 to the right, which
// is below φTth = 9.015; bt + d = 16 + 25.625 = 41.625 in, by the top bars.
func TestStirrupsGoOnBeyondTheirNeed(t *testing.T) {
	closed := func(to float64, open bool) *beam.Result {
		return twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) {
			twistedSpan(24/1.4, 6)(b, l)
			rest := l.Transverse[0]
			l.Transverse[0].To, rest.From, rest.Mark, rest.Form = in(to), in(to), "O", "open"
			if open {
				l.Transverse = append(l.Transverse, rest)
			}
		})
	}
	require.Empty(t, torsionFailures(closed(72+41.63, true)))
	require.ElementsMatch(t, []string{"torsion.transverse", "torsion.minimum-stirrups", "torsion.closed"}, torsionFailures(closed(72+41.62, true)))
	require.Contains(t, torsionFailures(closed(60, false)), "torsion.transverse", "a bare length where torsion acts")
	require.ElementsMatch(t, []string{"torsion.transverse", "torsion.closed"}, torsionFailures(closed(80, false)), "a bare length within bt + d of it")
}

// So do those that a greater torque needs, beside a lesser one: of 60 kip-ft of
// 1.4D at 6 ft, 45 go to the left and 15, above φTth, to the right. Shear needs
// no stirrups.
func TestStirrupsOfAGreaterTorqueGoOn(t *testing.T) {
	const flow = 0.85 * 12.5 * 24.5
	leg := func(torque float64) float64 { return torque * 12000 / (2 * 0.75 * flow * 60000) }
	for _, tc := range []struct {
		from, want float64
		note       string
	}{{72 + 41.62, leg(45), noteReach}, {72 + 41.63, leg(15), ""}} {
		r := twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) {
			twistedSpan(60/1.4, 6)(b, l)
			rest := l.Transverse[0]
			l.Transverse[0].To, rest.From, rest.Mark = in(tc.from), in(tc.from), "R"
			l.Transverse = append(l.Transverse, rest)
		})
		var c *beam.Check
		for i := range r.Checks {
			if r.Checks[i].ID == "torsion.transverse" {
				c = &r.Checks[i] // the last is of the zone to the right
			}
		}
		require.InEpsilon(t, tc.want, valueIn(t, c.Demand, "in2/in"), 1e-9, "%g", tc.from)
		require.Equal(t, tc.note, c.Reason)
		require.InDelta(t, tc.from, c.At.In(units.Inch), 1e-9, "the section judged is of the zone itself")
		require.Equal(t, tc.note != "", strings.Contains(notesOf(c), "bt + d = 41.625 in"))
		requireEvaluable(t, c)
		section := 0.0
		for i := range r.Checks {
			if r.Checks[i].ID == "torsion.section" {
				section = valueIn(t, r.Checks[i].Demand, "psi")
			}
		}
		require.Less(t, section, 45*12000*74/(1.7*12.5*24.5*12.5*24.5), "the section bears its own torque alone")
		found := false
		for _, a := range r.Assumptions {
			found = found || a.ID == "reading.torsion-extent"
		}
		require.True(t, found, "the reading is named")
	}
}

// notesOf joins the notes of a check's working.
func notesOf(c *beam.Check) string {
	var notes []string
	for _, s := range c.Steps {
		notes = append(notes, s.Note)
	}
	return strings.Join(notes, "\n")
}

// 9.4.4.3: a torque within d of the face is designed for at the face; d = 25.5
// in., the face at 6 in.
func TestConcentratedTorqueWithinDepth(t *testing.T) {
	for _, tc := range []struct {
		at   float64
		note string
	}{{31.5, noteTorqueInDepth}, {31.6, noteAtDepth}, {5.9, noteAtDepth}} {
		_, trial := twistedTrial(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) { twistedSpan(30, tc.at/12)(b, l) })
		ends := shearEnds(trial, 1)
		require.Equal(t, tc.note, ends[0].note, "%g", tc.at)
	}
}

// Torque alone, with nothing that bends or shears the beam, is still judged. With
// No. 3 stirrups x1 = 12.625 and y1 = 24.625 in.
func TestTorqueAlone(t *testing.T) {
	r := twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) {
		twistedSpan(60, 12)(b, l)
		b.Loads, b.NoSelfWeight = b.Loads[1:], true
		l.Transverse[0].Bar = "#3"
		l.Transverse[0].Spacing = in(9)
	})
	c := find1(t, r, "torsion.transverse")
	require.Equal(t, beam.Fail, c.Outcome)
	require.InEpsilon(t, 42*12000/(2*0.75*0.85*12.625*24.625*60000), valueIn(t, c.Demand, "in2/in"), 1e-9)
}

// A torque whose path is not stated is taken as needed for equilibrium, and
// said to be.
func TestUnstatedPath(t *testing.T) {
	stated := func(path beam.TorquePath) bool {
		r := twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) { b.Demands[0].Path = path })
		for _, a := range r.Assumptions {
			if a.ID == "torsion.path" {
				require.True(t, a.Open)
				return true
			}
		}
		return false
	}
	require.True(t, stated(0))
	require.False(t, stated(beam.EquilibriumTorque))
	require.False(t, stated(beam.CompatibilityTorque))
	r := twisted(t, ACI31819(), twistedSpan(60, 12))
	require.Contains(t, strings.Join(r.Cautions, "\n"), "path is not stated")
	require.Contains(t, strings.Join(r.Cautions, "\n"), "holds the beam against twist")
}

// Axial force enters the threshold, the shear beside the torque and the
// longitudinal steel.
func TestTorsionUnderAxialForce(t *testing.T) {
	pull := twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) {
		b.Demands[0].Axial, b.Demands[0].Torque = units.Kip.Of(-60), units.KipFoot.Of(7) // below φTth of no axial force
	})
	c := find1(t, pull, "torsion.threshold")
	require.Equal(t, beam.NotApplicable, c.Outcome)
	want := 0.75 * math.Sqrt(4000) * 448 * 448 / 88 * math.Sqrt(1-60000/(4*448*math.Sqrt(4000)))
	require.InEpsilon(t, want, valueIn(t, c.Capacity, "lb-in"), 1e-9)
	none := twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) {
		b.Demands[0].Axial, b.Demands[0].Torque = units.Kip.Of(-60), units.KipFoot.Of(15)
	})
	bare := twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) { b.Demands[0].Torque = units.KipFoot.Of(15) })
	for _, id := range []string{"torsion.longitudinal.bottom", "torsion.longitudinal.top"} {
		require.Greater(t, find1(t, none, id).Utilization, find1(t, bare, id).Utilization, id)
	}
	for _, r := range []*beam.Result{pull, none} {
		for i := range r.Checks {
			if c := &r.Checks[i]; strings.HasPrefix(c.ID, "torsion.") && len(c.Steps) > 0 {
				requireEvaluable(t, c)
			}
		}
	}
}

// Bent bars take their part of the shear, and a hung load its part of the legs,
// in the working too.
func TestTorsionBesideBentBarsAndHungLoads(t *testing.T) {
	bent := func(b *beam.Brief, l *beam.Layout) {
		twistedSpan(40, 9)(b, l)
		b.Loads[0].Intensity = units.KipPerFoot.Of(4.5)
		l.Transverse[0].Bar, l.Transverse[0].Spacing = "#4", in(5)
		l.Longitudinal[0] = bottom(6, "#9")
		l.Bent = []beam.BentBars{{Mark: "X", Bar: "#8", Count: 2, Span: 1, At: in(40), Angle: 45, Rises: "left"}}
	}
	hung := func(b *beam.Brief, l *beam.Layout) {
		bent(b, l)
		l.Bent = nil
		b.Loads[0].Hung = true
	}
	for name, edit := range map[string]func(*beam.Brief, *beam.Layout){"bent": bent, "hung": hung} {
		_, with := twistedTrial(t, ACI31819(), edit)
		seen := map[string]bool{}
		checks := us19.judgeShearing(nil, with)
		for i := range checks {
			if c := &checks[i]; strings.HasPrefix(c.ID, "torsion.") && len(c.Steps) > 0 {
				requireEvaluable(t, c)
				for _, s := range c.Steps {
					seen[c.ID+" "+s.Symbol] = true
				}
			}
		}
		require.True(t, seen["torsion.transverse "+map[string]string{"bent": "Vs,req", "hung": "al"}[name]], name)
	}
	// What hangs takes the legs: 1.4 × 4.5 kip/ft over φ fyt, two legs.
	_, up := twistedTrial(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) { hung(b, l); b.Loads[0].Hung = false })
	_, down := twistedTrial(t, ACI31819(), hung)
	at := units.Foot.Of(8)
	for i, tr := range []*beam.Trial{up, down} {
		z := us19.newWebZone(tr, 1, 0, in(5))
		z.bends = [2]bool{true, false}
		z.point(tr.Forces.Action(0, 1, at, true))
		v := z.torsion.transverse.values
		require.InDelta(t, float64(i)*1.4*4500/12/(0.75*60000), v.lift, 1e-9)
		require.InDelta(t, v.shear/2+v.lift/2+v.leg, v.outer, 1e-12)
	}
}

// In every edition and of every shape the working gives what was compared.
func TestWorkingOfTorsion(t *testing.T) {
	tee := func(b *beam.Brief, _ *beam.Layout) {
		b.Section = beam.Section{Shape: beam.Tee, Width: in(16), Depth: in(28), FlangeThickness: in(6), FlangeWidth: in(60)}
	}
	thin := func(b *beam.Brief, l *beam.Layout) {
		tee(b, l)
		b.Section.FlangeThickness = in(2)
	}
	hollow := func(wall float64) func(*beam.Brief, *beam.Layout) {
		return func(b *beam.Brief, l *beam.Layout) {
			b.Section = box(wall)
			b.Demands[0].Torque = units.KipFoot.Of(200)
			l.Longitudinal = []beam.Row{bottom(6, "#9"), top(6, "#9"), {Mark: "W", Bar: "#9", Count: 3, Face: beam.Side, Spacing: in(8.7)}}
			l.Transverse[0].Bar = "#5"
		}
	}
	flat := func(b *beam.Brief, l *beam.Layout) {
		hollow(12)(b, l)
		for i := range b.Section.Voids[0] {
			if p := &b.Section.Voids[0][i]; p.Y == in(28) {
				p.Y = in(36)
			}
		}
		b.Demands[0].Shear = units.Kip.Of(1)
	}
	hogging := func(b *beam.Brief, _ *beam.Layout) { b.Demands[0].Moment = units.KipFoot.Of(-60) }
	span := func(b *beam.Brief, l *beam.Layout) {
		twistedSpan(60, 9)(b, l)
		b.Loads[1].Path = beam.CompatibilityTorque
		b.Loads = append(b.Loads, beam.Load{Case: beam.Dead, Shape: beam.UniformTorque, Moment: units.KipFoot.Of(20), Path: beam.EquilibriumTorque})
	}
	strong := func(b *beam.Brief, _ *beam.Layout) {
		b.Concrete.Strength, b.Reinforcement.StirrupYield = psi(12000), psi(80000)
		b.Demands[0].Axial, b.Readings.TorsionAngle = units.Kip.Of(-40), 40
	}
	metric := strings.NewReplacer("#4", "No. 13", "#5", "No. 16", "#6", "No. 19", "#8", "No. 25", "#9", "No. 29")
	for name, edit := range map[string]func(*beam.Brief, *beam.Layout){
		"plain": nil, "tee": tee, "thin flange": thin, "box": hollow(8), "thin box": hollow(5), "thin top": flat,
		"hogging": hogging, "span": span, "strong": strong,
	} {
		for _, c := range Editions() {
			r, trial := twistedTrial(t, c, func(b *beam.Brief, l *beam.Layout) {
				if edit != nil {
					edit(b, l)
				}
				if c.e.system == units.SI {
					b.Reinforcement.Catalog = "astm-metric"
					for i := range l.Longitudinal {
						l.Longitudinal[i].Bar = metric.Replace(l.Longitudinal[i].Bar)
					}
					for i := range l.Transverse {
						l.Transverse[i].Bar = metric.Replace(l.Transverse[i].Bar)
					}
				}
			})
			require.True(t, trial.Twisted)
			judged := 0
			for i := range r.Checks {
				k := &r.Checks[i]
				if !strings.HasPrefix(k.ID, "torsion.") || len(k.Steps) == 0 {
					continue
				}
				judged++
				requireEvaluable(t, k)
				if k.ID == "torsion.transverse" || k.ID == "torsion.section" || strings.HasPrefix(k.ID, "torsion.longitudinal.") {
					found := map[bool]bool{}
					for _, s := range k.Steps {
						found[math.Abs(s.Value.SI()-k.Demand.SI()) <= 1e-9*math.Abs(k.Demand.SI()) && s.Value.Dimension() == k.Demand.Dimension()] = true
					}
					require.True(t, found[true], "%s, %s, %s: the demand is a step", name, c.e.id, k.ID)
				}
			}
			require.GreaterOrEqual(t, judged, 8, "%s, %s", name, c.e.id)
			// The verdicts are the same without working.
			trial.Record = false
			for _, g := range []beam.Group{beam.Bending, beam.Shearing, beam.Whole} {
				for _, k := range c.Judge(nil, g, trial) {
					if strings.HasPrefix(k.ID, "torsion.") {
						require.Equal(t, find2(t, r, &k).Outcome, k.Outcome, "%s, %s, %s", name, c.e.id, k.ID)
					}
				}
			}
		}
	}
}

// find2 is the check of a result at the same place and face.
func find2(t testing.TB, r *beam.Result, like *beam.Check) *beam.Check {
	t.Helper()
	for i := range r.Checks {
		if c := &r.Checks[i]; c.ID == like.ID && c.Face == like.Face && c.Span == like.Span {
			return c
		}
	}
	require.Fail(t, "no check "+like.ID)
	return nil
}

// What leaves nothing to compare fails, with the reason.
func TestTorsionWithoutAnythingToCompare(t *testing.T) {
	for _, tc := range []struct {
		name, reason string
		edit         func(*beam.Brief, *beam.Layout)
		ids          []string
	}{
		{"cover without room", noteNoCage, func(b *beam.Brief, l *beam.Layout) { b.Cover = in(7.9) },
			[]string{"torsion.section", "torsion.transverse", "torsion.longitudinal.bottom", "torsion.longitudinal.top", "torsion.longitudinal.side"}},
		{"hollow and cover without room", noteNoCage, func(b *beam.Brief, l *beam.Layout) {
			at := func(x, y float64) beam.Point { return beam.Point{X: in(x), Y: in(y)} }
			b.Section = beam.Section{
				Shape: beam.Polygon, Outline: []beam.Point{at(0, 0), at(16, 0), at(16, 28), at(0, 28)},
				Voids: [][]beam.Point{{at(6, 10), at(10, 10), at(10, 18), at(6, 18)}},
			}
			b.Cover = in(7.9)
		}, []string{"torsion.wall", "torsion.section"}},
		{"more moment than steel can carry", noteBeyondBending, func(b *beam.Brief, l *beam.Layout) { b.Demands[0].Moment = units.KipFoot.Of(900) },
			[]string{"torsion.longitudinal.bottom"}},
		{"no steel in tension to measure d to", noteNoDepth, func(b *beam.Brief, l *beam.Layout) { l.Longitudinal = l.Longitudinal[1:2] },
			[]string{"torsion.section", "torsion.transverse"}},
	} {
		t.Run(tc.name, func(t *testing.T) {
			r := twisted(t, ACI31819(), tc.edit)
			for _, id := range tc.ids {
				c := find1(t, r, id)
				require.Equal(t, beam.Fail, c.Outcome, id)
				require.Equal(t, tc.reason, c.Reason, id)
			}
			require.Equal(t, beam.Unsatisfied, r.Verdict)
		})
	}
}

// Bars beside the web are outside the closed stirrups: they help in bending,
// not in torsion (9.7.5.1).
func TestBarsBesideTheWebDoNotCountInTorsion(t *testing.T) {
	edit := func(web string, moment float64) func(b *beam.Brief, l *beam.Layout) {
		return func(b *beam.Brief, l *beam.Layout) {
			b.Section = beam.Section{Shape: beam.Tee, Width: in(16), Depth: in(28), FlangeThickness: in(6), FlangeWidth: in(48)}
			b.Demands[0].Moment, b.Demands[0].Torque = units.KipFoot.Of(moment), units.KipFoot.Of(44)
			l.Longitudinal = []beam.Row{bottom(3, "#9"), top(2, web), l.Longitudinal[2],
				{Mark: "F", Bar: "#7", Count: 4, Face: beam.Top, Layer: 1, Flange: true, Spacing: in(5)}}
		}
	}
	// The least steel governs: Acp = 16 × 28 + 2 × 16 × 6 = 640 in2, with
	// flanges as wide as they are.
	al := 44.0 / 45 * ownLong(60000)
	require.Less(t, al, 5*math.Sqrt(4000)*640/60000-al)
	share := (5*math.Sqrt(4000)*640/60000 - al) * (12.5 + 24.5/3) / 74
	require.Greater(t, share, 0.4)
	r := twisted(t, ACI31819(), edit("#4", -1))
	c := find1(t, r, "torsion.longitudinal.top")
	require.Equal(t, beam.Fail, c.Outcome)
	require.InEpsilon(t, share, valueIn(t, c.Demand, "in2"), 1e-9)
	require.InEpsilon(t, 0.4, valueIn(t, c.Capacity, "in2"), 1e-9)
	require.Contains(t, c.Reason, "beside the web")
	requireEvaluable(t, c)
	r = twisted(t, ACI31819(), edit("#4", 1)) // the same where the face is pressed a little
	c = find1(t, r, "torsion.longitudinal.top")
	require.Equal(t, beam.Fail, c.Outcome)
	requireEvaluable(t, c)
	require.Equal(t, beam.Pass, find1(t, twisted(t, ACI31819(), edit("#5", -1)), "torsion.longitudinal.top").Outcome)
}

// Layers of bars count as bars along the side where their outer bars stand at
// the legs: their distance, and what is left above them.
func TestWidestDistanceRoundTheSection(t *testing.T) {
	_, trial := twistedTrial(t, ACI31819(), func(_ *beam.Brief, l *beam.Layout) {
		l.Longitudinal = append(l.Longitudinal, beam.Row{Mark: "B2", Bar: "#8", Count: 2, Face: beam.Bottom, Layer: 2})
		l.Longitudinal[2].Spacing, l.Longitudinal[2].Count = in(4), 1
	})
	gap, found := widestAlongSide(trial)
	require.True(t, found)
	// Layers at 2.5 and 4.5 in., a side bar 4 in. above them, the top bars at 25.625 in.
	require.InEpsilon(t, 25.625-8.5, gap.In(units.Inch), 1e-9)
	trial.Side = beam.SideSteel{}
	gap, _ = widestAlongSide(trial)
	require.InEpsilon(t, 25.625-4.5, gap.In(units.Inch), 1e-9)
	r, _ := twistedTrial(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) {
		b.Section.Width, b.Demands[0].Torque = in(40), units.KipFoot.Of(100)
		l.Longitudinal[0] = bottom(2, "#11")
	})
	c := find1(t, r, "torsion.longitudinal-spacing")
	require.Equal(t, beam.Bottom, c.Face)
	require.Greater(t, valueIn(t, c.Demand, "in"), 30.0)
}

// The bars along the sides count with their own yield strength, as it may be
// used in torsion.
func TestSideBarsOfTheirOwnGrade(t *testing.T) {
	need := func(yield float64) *beam.Check {
		r := twisted(t, ACI31819(), func(_ *beam.Brief, l *beam.Layout) { l.Longitudinal[2].Yield = psi(yield) })
		return find1(t, r, "torsion.longitudinal.side")
	}
	sixty := valueIn(t, need(0).Demand, "in2")
	require.InEpsilon(t, ownLong(60000)*24.5*2/3/74, sixty, 1e-9)
	for yield, want := range map[float64]float64{60000: sixty, 80000: sixty, 40000: 1.5 * sixty, 20000: 3 * sixty} {
		c := need(yield)
		require.InEpsilon(t, want, valueIn(t, c.Demand, "in2"), 1e-9, "%g", yield)
		require.Equal(t, want > 0.62, c.Outcome == beam.Fail, "%g", yield)
		requireEvaluable(t, c)
	}
}

// Mirrored, the stirrups of the greater torque go on to the left; and of a
// torque that falls evenly those of the section bt + d before a zone reach it.
func TestStirrupsGoOnEitherWay(t *testing.T) {
	leg := func(torque float64) float64 {
		return torque * 12000 / (2 * 0.75 * 0.85 * 12.5 * 24.5 * 60000)
	}
	zones := func(at float64, edit func(b *beam.Brief)) (out []float64) {
		r := twisted(t, ACI31819(), func(b *beam.Brief, l *beam.Layout) {
			twistedSpan(60/1.4, 18)(b, l)
			if edit != nil {
				edit(b)
			}
			rest := l.Transverse[0]
			l.Transverse[0].To, rest.From, rest.Mark = in(at), in(at), "R"
			l.Transverse = append(l.Transverse, rest)
		})
		for i := range r.Checks {
			if c := &r.Checks[i]; c.ID == "torsion.transverse" {
				out = append(out, valueIn(t, c.Demand, "in2/in"))
			}
		}
		return out
	}
	require.InEpsilon(t, leg(45), zones(216-41.62, nil)[0], 1e-9)
	require.InEpsilon(t, leg(15), zones(216-41.63, nil)[0], 1e-9)

	// 1.4 × 60 kip-ft over a cantilever of 24 ft: the first zone has the torque at
	// d from the face, the second that at 100 - 41.625 in.
	even := func(b *beam.Brief) {
		b.Loads[1] = beam.Load{Case: beam.Dead, Shape: beam.UniformTorque, Moment: units.KipFoot.Of(60)}
		b.Supports[1].Kind, b.Supports[1].Width = statics.Free, units.Length{}
		b.Supports[0].Kind = statics.Fixed
		b.Loads[0].Intensity = units.KipPerFoot.Of(0.01)
	}
	got := zones(100, even)
	require.InEpsilon(t, leg(84*(288-31.625)/288), got[0], 1e-9, "d is that of the top bars")
	require.InEpsilon(t, leg(84*(288-100+41.625)/288), got[1], 1e-8)
}
