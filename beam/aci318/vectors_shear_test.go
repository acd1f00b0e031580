package aci318

import (
	"strconv"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/internal/vectors"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// TestPublishedShear runs the published examples of shear and torsion.
func TestPublishedShear(t *testing.T) {
	vectors.Run(t, vectors.Load(t, "aci318/shear.json"), func(t *testing.T, c *vectors.Case, code string) {
		e := codeOf(t, code).e
		switch c.Asks {
		case "concrete":
			c.Meet(publishedConcrete(t, c, e))
		case "stirrups":
			c.Meet(publishedStirrups(t, c, e))
		case "torsion":
			s := torsionOf(t, e, beam.Section{Width: c.Length("b"), Depth: c.Length("h")}, &beam.Concrete{Strength: c.Stress("fc")}, units.Force{})
			c.Meet(map[string]units.Amount{"Tth": e.momentOf(s.threshold).Amount(), "Tcr": e.momentOf(s.cracking).Amount()})
		default:
			require.Fail(t, "unknown kind of case", c.Asks)
		}
	})
}

// publishedConcrete is Vc of a section with just the least stirrups, or none.
func publishedConcrete(t *testing.T, c *vectors.Case, e *edition) map[string]units.Amount {
	t.Helper()
	s := shearSection{
		strength: c.Stress("fc"), light: lightness{factor: c.Number("lambda")}, width: c.Length("b"), height: c.Length("d").Scale(1.1),
		depth: c.Length("d"), area: c.Area("As"),
	}
	s.stirrups.yield = e.stressOf(e.materials.grade60)
	w := e.newWebSteel(&s)
	switch c.Options["stirrups"] {
	case "none":
	case "least":
		s.stirrups.spacing = e.lengthOf(w.mostAlong)
		s.stirrups.area = e.areaOf(w.least * w.mostAlong)
		w = e.newWebSteel(&s)
		require.True(t, w.enough)
	default:
		require.Fail(t, "unknown stirrups", c.Options["stirrups"])
	}
	v := w.at(e, shearForces{})
	return map[string]units.Amount{"Vc": e.forceOf(v.concrete.strength).Amount()}
}

// publishedStirrups is a section with stirrups of area Av at its greatest
// spacing, under a shear that is given or that follows from L and wu.
func publishedStirrups(t *testing.T, c *vectors.Case, e *edition) map[string]units.Amount {
	t.Helper()
	found := map[string]units.Amount{}
	shear := c.Force("Vu")
	if c.Has("L") {
		load, _ := c.Amount("wu", units.DimLineLoad).LineLoad()
		b := usBrief()
		b.Spans, b.NoSelfWeight = []units.Length{c.Length("L")}, true
		b.Supports = []beam.Support{{Kind: statics.Pinned}, {Kind: statics.Roller}}
		b.Loads = []beam.Load{{Case: beam.Dead, Shape: beam.Uniform, Intensity: load.Scale(1 / 1.4)}} // 1.4D
		f := problemOf(t, Code{e}, b).Forces
		shear = f.Action(0, 1, c.Length("d"), true).Shear
		found["Vu_support"] = f.Action(0, 1, units.Length{}, true).Shear.Amount()
		found["Vu_at_d"] = shear.Amount()
	}
	s := shearSection{
		strength: c.Stress("fc"), light: lightness{factor: 1}, width: c.Length("b"), height: c.Length("h"), depth: c.Length("d"), area: c.Area("As"),
	}
	s.stirrups = stirrupSteel{area: c.Area("Av"), yield: c.Stress("fyt"), spacing: c.Length("d").Scale(0.5)}
	w := e.newWebSteel(&s)
	require.True(t, w.enough)
	v := w.at(e, shearForces{shear: shear})
	found["Vc"] = e.forceOf(v.concrete.strength).Amount()
	found["phiVc"] = e.forceOf(w.phi * v.concrete.strength).Amount()
	found["Vs_required"] = e.forceOf(v.needed).Amount()
	found["s_required"] = e.lengthOf(w.av * w.fyt * w.bare.d / v.needed).Amount()
	found["s_max"] = e.lengthOf(v.along).Amount()
	return found
}

// TestPublishedDetailing runs the published values of crack control and of
// side-face bars.
func TestPublishedDetailing(t *testing.T) {
	vectors.Run(t, vectors.Load(t, "aci318/detailing.json"), func(t *testing.T, c *vectors.Case, code string) {
		e := codeOf(t, code).e
		fs := c.Stress("fs")
		if c.Has("fy") {
			fs = e.crackStress(c.Stress("fy"))
		}
		most := e.crackSpacing(fs, c.Length("cc"))
		switch c.Asks {
		case "crack-spacing":
			c.Meet(map[string]units.Amount{"fs": fs.Amount(), "s_max": most.Amount()})
		case "crack-bars":
			c.Meet(publishedBars(t, c, most))
		case "side-face":
			c.Meet(publishedSideFace(c, e, most))
		default:
			require.Fail(t, "unknown kind of case", c.Asks)
		}
	})
}

// publishedBars is the least number of bars for each width asked for.
func publishedBars(t *testing.T, c *vectors.Case, most units.Length) map[string]units.Amount {
	t.Helper()
	found := map[string]units.Amount{}
	edge := c.Length("cc").Add(c.Length("db").Scale(0.5))
	for name := range c.Expect {
		width, err := strconv.ParseFloat(strings.TrimPrefix(name, "n_"), 64)
		require.NoError(t, err)
		n := 2
		for between := units.Inch.Of(width).Sub(edge.Scale(2)); !between.Scale(1 / float64(n-1)).AtMost(most); {
			n++
		}
		found[name] = units.Plain(float64(n))
	}
	return found
}

// publishedSideFace counts the side bars at the greatest spacing that leave no
// gap wider than that.
func publishedSideFace(c *vectors.Case, e *edition, most units.Length) map[string]units.Amount {
	tr := &beam.Trial{Problem: &beam.Problem{}}
	tr.Brief.Section.Depth = c.Length("h")
	tr.Bottom.Nearest = c.Length("y")
	tr.Bottom.Farthest = tr.Bottom.Nearest
	tr.Side = beam.SideSteel{Spacing: most, TensionFace: beam.Bottom}
	needed := 0.0
	if !units.AtMost(e.lengthIn(c.Length("h")), e.crack.deep) {
		needed = 1
	}
	for !sideGap(tr, beam.Bottom).AtMost(most) {
		tr.Side.Each++
	}
	return map[string]units.Amount{
		"needed": units.Plain(needed), "s_max": most.Amount(), "each": units.Plain(float64(tr.Side.Each)),
	}
}
