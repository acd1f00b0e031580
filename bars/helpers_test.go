package bars_test

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/bars"
	"soffit.example/units"
)

func inches(v float64) units.Length { return units.Inch.Of(v) }

func millimetres(v float64) units.Length { return units.Millimetre.Of(v) }

// size finds an embedded size that the test takes for granted.
func size(t testing.TB, catalog, name string) bars.Size {
	t.Helper()
	c, err := bars.Lookup(catalog)
	require.NoError(t, err)
	s, err := c.Size(name)
	require.NoError(t, err)
	return s
}

// inchRule is the clear distance of ACI 318-19 25.2.1 and 25.2.2 in inches,
// with aggregate small enough not to matter.
func inchRule() bars.Clearances {
	return bars.Clearances{
		InLayer:       bars.Clearance{Least: inches(1), Diameters: 1},
		BetweenLayers: bars.Clearance{Least: inches(1)},
	}
}

// inchCage has 1.5 in of cover to a stirrup.
func inchCage(t testing.TB, width float64, stirrup string) bars.Cage {
	t.Helper()
	return bars.Cage{
		Width: inches(width), SideCover: inches(1.5), FaceCover: inches(1.5),
		Stirrup: size(t, "astm-inch", stirrup),
	}
}
