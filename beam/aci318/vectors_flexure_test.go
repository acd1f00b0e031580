package aci318

import (
	"fmt"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/internal/vectors"
	"soffit.example/beam/mechanics"
	"soffit.example/units"
)

// codeOf is the edition of an id.
func codeOf(t *testing.T, id string) Code {
	t.Helper()
	for _, c := range Editions() {
		if c.e.id == id {
			return c
		}
	}
	require.Fail(t, "unknown code", id)
	return Code{}
}

// TestPublishedFlexure runs the published examples of bending.
func TestPublishedFlexure(t *testing.T) {
	vectors.Run(t, vectors.Load(t, "aci318/flexure.json"), func(t *testing.T, c *vectors.Case, code string) {
		e := codeOf(t, code).e
		switch c.Asks {
		case "strength":
			c.Meet(publishedStrength(t, c, e))
		case "required":
			c.Meet(publishedRequired(t, c, e))
		case "effective-flange":
			c.Meet(publishedFlange(t, c, e))
		default:
			require.Fail(t, "unknown kind of case", c.Asks)
		}
	})
}

// publishedFlange is an interior beam of a floor with webs at one spacing.
func publishedFlange(t *testing.T, c *vectors.Case, e *edition) map[string]units.Amount {
	t.Helper()
	h, bw, spacing := c.Length("h"), c.Length("bw"), c.Length("spacing")
	clear := spacing.Sub(bw)
	b := usBrief()
	b.Section = beam.Section{Shape: beam.Tee, Width: bw, Depth: units.Inch.Of(20), FlangeThickness: h, Slab: beam.Slab{ClearLeft: clear, ClearRight: clear}}
	b.Spans = []units.Length{c.Length("ln")}
	b.Supports[0].Width, b.Supports[1].Width = units.Length{}, units.Length{}
	b, _ = resolved(t, Code{e}, b)
	o := overhangOf(true, h, clear, b.Spans[0])
	both := func(side units.Length) units.Amount { return bw.Add(side.Scale(2)).Amount() }
	return map[string]units.Amount{
		"be": b.Section.FlangeWidth.Amount(), "by_thickness": both(o.byThickness), "by_spacing": both(o.byWeb),
	}
}

// publishedStrength takes layers As1 at d1, As2 at d2 ... from the compression
// face of a rectangle b by h, or from the top face of a tee of bf, hf and bw.
// Where the source gives no h, it does not enter.
func publishedStrength(t *testing.T, c *vectors.Case, e *edition) map[string]units.Amount {
	t.Helper()
	fc, fy := c.Stress("fc"), c.Stress("fy")
	var section mechanics.Section
	var farthest units.Length
	for i := 1; c.Has(fmt.Sprintf("As%d", i)); i++ {
		l := mechanics.Layer{Depth: c.Length(fmt.Sprintf("d%d", i)), Area: c.Area(fmt.Sprintf("As%d", i)), Steel: e.barSteel(fy)}
		section.Layers = append(section.Layers, l)
		farthest = farthest.Max(l.Depth)
	}
	h := c.Length("h")
	if h.IsZero() {
		h = farthest.Scale(1.1)
	}
	if c.Has("bf") {
		section.Parts = mechanics.Tee(c.Length("bf"), c.Length("hf"), c.Length("bw"), h)
	} else {
		section.Parts = mechanics.Rectangle(c.Length("b"), h)
	}
	sense := beam.Positive
	switch c.Options["bending"] {
	case "", "positive":
	case "negative":
		sense = beam.Negative
	default:
		require.Fail(t, "unknown sense", c.Options["bending"])
	}
	readings := beam.Readings{IgnoreDisplaced: c.Options["displaced_concrete"] == "ignore"}
	f, err := e.flexureStrength(section, fc, sense, &readings)
	require.NoError(t, err)
	return map[string]units.Amount{
		"a": f.BlockDepth.Amount(), "c": f.NeutralAxis.Amount(), "strain": units.Plain(f.ExtremeStrain), "phi": units.Plain(f.Phi),
		"Mn": f.Nominal.Amount(), "phiMn": f.Design.Amount(), "As_min": f.MinimumSteel.Amount(),
		"rho_min": units.Plain(f.MinimumSteel.Ratio(webWidth(section).MulLength(f.EffectiveDepth))),
	}
}

func publishedRequired(t *testing.T, c *vectors.Case, e *edition) map[string]units.Amount {
	t.Helper()
	q := SteelQuery{Section: rectangle(c.Length("b"), c.Length("d1").Scale(1.1)), Depth: c.Length("d1"), Strength: c.Stress("fc"), Yield: c.Stress("fy"), Moment: c.Moment("Mu")}
	s, err := Code{e}.RequiredSteel(q)
	require.NoError(t, err)
	m := e.minimumSteel(q.Strength, q.Yield, e.minimumWidth(q.Section.Width, q.Section.Width, true), q.Depth)
	return map[string]units.Amount{
		"As": s.Tension.Amount(), "strain": units.Plain(s.Strain), "As_min": e.areaOf(m.area).Amount(),
	}
}
