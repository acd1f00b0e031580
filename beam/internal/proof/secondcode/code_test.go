package secondcode_test

import (
	"context"
	"fmt"
	"go/parser"
	"go/token"
	"io/fs"
	"math/rand/v2"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/beam/internal/proof/secondcode"
	"soffit.example/beam/statics"
	"soffit.example/units"
)

// member is a simply supported beam of the made-up code.
func member(width, depth, span, dead, live float64) beam.Brief {
	return beam.Brief{
		Section:       beam.Section{Shape: beam.Rectangular, Width: units.Millimetre.Of(width), Depth: units.Millimetre.Of(depth)},
		Concrete:      beam.Concrete{Strength: units.Megapascal.Of(30)},
		Reinforcement: beam.Reinforcement{Catalog: "en-10080", Yield: units.Megapascal.Of(500)},
		Spans:         []units.Length{units.Metre.Of(span)},
		Supports: []beam.Support{
			{Kind: statics.Pinned, Width: units.Millimetre.Of(250)},
			{Kind: statics.Roller, Width: units.Millimetre.Of(250)},
		},
		Loads: []beam.Load{
			{Case: beam.Dead, Shape: beam.Uniform, Intensity: units.KilonewtonPerMetre.Of(dead)},
			{Case: beam.Live, Shape: beam.Uniform, Intensity: units.KilonewtonPerMetre.Of(live)},
		},
		Preferences: beam.Preferences{NoCures: true},
	}
}

func design(t *testing.T, b beam.Brief) *beam.Result {
	t.Helper()
	r, err := beam.Design(context.Background(), secondcode.Code{}, b)
	require.NoError(t, err)
	return r
}

// TestDesignsByHand checks a design of the made-up code against its own
// formulas worked by hand: a single layer, simply supported.
func TestDesignsByHand(t *testing.T) {
	b := member(300, 550, 6, 18, 15)
	b.Preferences.Bars, b.Preferences.Stirrups = []string{"16", "20", "25"}, []string{"8", "10"}
	b.Preferences.MaxLayers = 1
	r := design(t, b)
	require.Equal(t, beam.Satisfied, r.Verdict, r.Binding)

	// 1.25 G + 1.5 Q with 2500 kg/m3 of self-weight.
	w := 1.25*(18+0.3*0.55*2500*9.80665/1000) + 1.5*15
	moment := w * 36 / 8
	var area, sum float64
	for _, at := range r.Bars {
		if at.Face == beam.Bottom {
			size, err := bars.Lookup("en-10080")
			require.NoError(t, err)
			s, err := size.Size(at.Bar)
			require.NoError(t, err)
			a := s.Area.In(units.SquareMillimetre)
			area, sum = area+a, sum+a*at.Y.In(units.Millimetre)
		}
	}
	d := 550 - sum/area
	force := area * 500 / 1.15
	block := force / (0.95 * 30 / 1.5 * 300)
	strength := force * (d - block/2) / 1e6

	check := find(t, r, "bending.strength")
	require.InEpsilon(t, moment, check.Demand.SI()/1000, 1e-9)
	require.InEpsilon(t, strength, check.Capacity.SI()/1000, 1e-9)
	require.Less(t, block/0.78, 0.40*d)
	require.LessOrEqual(t, moment, strength)

	z := r.Layout.Transverse
	require.NotEmpty(t, z)
	for _, c := range r.Checks {
		if c.ID == "shear.stirrups" {
			require.LessOrEqual(t, c.Utilization, 1+1e-9)
		}
	}
}

func find(t *testing.T, r *beam.Result, id string) beam.Check {
	t.Helper()
	for _, c := range r.Checks {
		if c.ID == id && (c.Outcome == beam.Pass || c.Outcome == beam.Fail) {
			return c
		}
	}
	require.Failf(t, "no check", "%s", id)
	return beam.Check{}
}

// TestSameDoors designs many briefs and puts every layout to CheckLayout: the
// answer is the same, and every verdict has its reason.
func TestSameDoors(t *testing.T) {
	rng := rand.New(rand.NewPCG(8318, 2))
	code := secondcode.Code{}
	verdicts := map[beam.Verdict]int{}
	for i := range 150 {
		b := member(200+50*float64(rng.IntN(6)), 300+50*float64(rng.IntN(10)), 3+6*rng.Float64(), 30*rng.Float64(), 30*rng.Float64())
		b.Preferences.Mixed = rng.IntN(3) == 0
		switch rng.IntN(6) {
		case 0:
			b.Loads = append(b.Loads, beam.Load{Case: beam.Wind, Shape: beam.Uniform, Intensity: units.KilonewtonPerMetre.Of(40 * rng.Float64())})
		case 1:
			b.Concrete.Strength = units.Megapascal.Of(40 + 30*rng.Float64())
		case 2:
			b.Supports[0] = beam.Support{Kind: statics.Fixed}
		case 3:
			b.Spans, b.Supports, b.Loads = nil, nil, nil
			b.Demands = []beam.Demand{
				{Name: "a", Moment: units.KilonewtonMetre.Of(300 * rng.Float64()), Shear: units.Kilonewton.Of(200 * rng.Float64())},
				{Name: "b", Moment: units.KilonewtonMetre.Of(-150 * rng.Float64()), Shear: units.Kilonewton.Of(100 * rng.Float64())},
			}
		}
		r := design(t, b)
		verdicts[r.Verdict]++
		if r.Verdict == beam.OutOfScope {
			require.NotEmpty(t, r.Refusals)
			continue
		}
		again, err := beam.CheckLayout(context.Background(), code, b, r.Layout)
		require.NoErrorf(t, err, "brief %d", i)
		require.Equalf(t, r.Checks, again.Checks, "brief %d", i)
		require.Equalf(t, r.Verdict == beam.Satisfied, !beam.Failing(r.Checks), "brief %d", i)
		for _, a := range r.Alternatives {
			other, err := beam.CheckLayout(context.Background(), code, b, a.Layout)
			require.NoErrorf(t, err, "brief %d", i)
			require.Equalf(t, beam.Satisfied, other.Verdict, "brief %d: %v", i, other.Binding)
		}
	}
	for _, v := range []beam.Verdict{beam.Satisfied, beam.Unsatisfied, beam.OutOfScope} {
		require.Greaterf(t, verdicts[v], 5, "%s", v)
	}
}

// TestStandsAlone holds the package to its promise: it imports no other
// code, and nothing imports it.
func TestStandsAlone(t *testing.T) {
	root, err := filepath.Abs("../../../..")
	require.NoError(t, err)
	here, err := os.Getwd()
	require.NoError(t, err)
	files := 0
	require.NoError(t, filepath.WalkDir(root, func(file string, d fs.DirEntry, err error) error {
		if err != nil || d.IsDir() || !strings.HasSuffix(file, ".go") {
			return err
		}
		f, err := parser.ParseFile(token.NewFileSet(), file, nil, parser.ImportsOnly)
		require.NoError(t, err)
		files++
		for _, s := range f.Imports {
			if filepath.Dir(file) == here {
				require.NotContainsf(t, s.Path.Value, "aci318", "%s", file)
			} else {
				require.NotContainsf(t, s.Path.Value, "secondcode", "%s", file)
			}
		}
		return nil
	}))
	require.Greater(t, files, 50)
}

// Example designs a beam under a code that the library has never heard of.
func Example() {
	b := member(300, 500, 5, 12, 10)
	b.Preferences.Bars, b.Preferences.Stirrups = []string{"16", "20"}, []string{"8"}
	r, err := beam.Design(context.Background(), secondcode.Code{}, b)
	if err != nil {
		fmt.Println(err)
		return
	}
	fmt.Println(r.Code, r.Verdict)
	for _, row := range r.Layout.Longitudinal {
		fmt.Println(row.Count, row.Bar, row.Face)
	}
	for _, c := range r.Checks {
		if c.ID == "bending.strength" && c.Outcome == beam.Pass {
			fmt.Printf("%.0f %% in bending\n", 100*c.Utilization)
		}
	}
	// Output:
	// Made-up 1 satisfied
	// 3 16 bottom
	// 2 16 top
	// 95 % in bending
}
