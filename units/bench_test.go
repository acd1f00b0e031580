package units_test

import (
	"encoding/json"
	"os/exec"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/units"
)

// A formula written with quantities costs what it costs in float64: nothing
// in it allocates.
func TestFormulasDoNotAllocate(t *testing.T) {
	area, fy := units.SquareInch.Of(3.16), units.KSI.Of(60)
	fc, width, depth := units.PSI.Of(4500), units.Inch.Of(16), units.Inch.Of(23.5)
	unit := units.KipFoot
	var sink float64
	require.Zero(t, testing.AllocsPerRun(100, func() {
		sink += nominalMoment(area, fy, fc, width, depth).In(unit)
		sink += width.Amount().SI() + depth.Max(width).Add(width).Sub(depth).Scale(2).Ratio(width)
		if width.AtMost(depth) && width.Compare(depth) < 0 {
			sink++
		}
	}))
	require.NotZero(t, sink)
}

// Reading text allocates only for errors and for decimal inches after feet.
func TestParseDoesNotAllocate(t *testing.T) {
	for _, text := range []string{"24 in", "1 1/2 in", "26 ft 6 in", "26 ft 6 3/4 in", "1.5e3 mm"} {
		require.Zero(t, testing.AllocsPerRun(100, func() {
			if _, err := units.ParseLength(text); err != nil {
				t.Error(err)
			}
		}), text)
	}
}

// The methods that formulas call must stay within the compiler's budget for
// inlining, for every quantity.
func TestInlining(t *testing.T) {
	out, err := exec.Command("go", "build", "-gcflags=-m", ".").CombinedOutput()
	require.NoError(t, err, "%s", out)
	inlined := map[string]bool{}
	for line := range strings.Lines(string(out)) {
		if _, name, ok := strings.Cut(strings.TrimSpace(line), ": can inline "); ok {
			inlined[name] = true
		}
	}
	for d, name := range typeNames {
		require.True(t, inlined[name+"Unit.Of"], "%sUnit.Of", name)
		for _, method := range []string{"In", "Add", "Sub", "Neg", "Abs", "Scale", "Ratio", "Less", "AtMost", "Max", "Min", "IsZero", "IsFinite", "Amount"} {
			require.True(t, inlined[name+"."+method], "%s.%s, dimension %s", name, method, d)
		}
	}
	for _, method := range []string{"AtMost", "Length.MulLength", "Stress.MulArea", "Moment.DivForce", "Area.PerLength", "Density.Weight", "Amount.Length"} {
		require.True(t, inlined[method], method)
	}
}

// nominalMoment is the closed form As fy (d - a/2) with a = As fy / (0.85 f'c b).
func nominalMoment(as units.Area, fy, fc units.Stress, b, d units.Length) units.Moment {
	tension := fy.MulArea(as)
	a := tension.DivStress(fc.Scale(0.85)).DivLength(b)
	return tension.MulLength(d.Sub(a.Scale(0.5)))
}

func nominalMomentFloat(as, fy, fc, b, d float64) float64 {
	tension := fy * as
	a := tension / (fc * 0.85) / b
	return tension * (d - a*0.5)
}

func TestNominalMomentTypedAsFloat(t *testing.T) {
	typed := nominalMoment(units.SquareInch.Of(3.16), units.KSI.Of(60), units.PSI.Of(4500), units.Inch.Of(16), units.Inch.Of(23.5))
	require.InEpsilon(t, nominalMomentFloat(3.16, 60, 4.5, 16, 23.5)/12, typed.In(units.KipFoot), 1e-15)
}

func BenchmarkFormula(b *testing.B) {
	b.Run("float64", func(b *testing.B) {
		as, fy, fc, w, d := 3.16*0.0254*0.0254, 4.1e8, 3.1e7, 0.4, 0.6
		for b.Loop() {
			nominalMomentFloat(as, fy, fc, w, d)
		}
	})
	b.Run("typed", func(b *testing.B) {
		as, fy, fc := units.SquareInch.Of(3.16), units.KSI.Of(60), units.PSI.Of(4500)
		w, d := units.Inch.Of(16), units.Inch.Of(23.5)
		for b.Loop() {
			nominalMoment(as, fy, fc, w, d)
		}
	})
}

func BenchmarkConvert(b *testing.B) {
	v, inch := 14.0, 0.0254
	unit := units.Inch
	b.Run("float64", func(b *testing.B) {
		for b.Loop() {
			v = v * inch / inch
		}
	})
	b.Run("unit known to the compiler", func(b *testing.B) {
		for b.Loop() {
			v = units.Inch.Of(v).In(units.Inch)
		}
	})
	b.Run("unit in a variable", func(b *testing.B) {
		for b.Loop() {
			v = unit.Of(v).In(unit)
		}
	})
}

func BenchmarkParse(b *testing.B) {
	for _, text := range []string{"24 in", "1 1/2 in", "26 ft 6 in", "26 ft 6.75 in", "123456.789012 mm", "24"} {
		b.Run(text, func(b *testing.B) {
			b.ReportAllocs()
			for b.Loop() {
				_, _ = units.ParseLength(text)
			}
		})
	}
}

func BenchmarkFormat(b *testing.B) {
	width := units.Inch.Of(14.375).Amount()
	b.ReportAllocs()
	for b.Loop() {
		units.US.Format(width)
	}
}

func BenchmarkJSON(b *testing.B) {
	for name, data := range map[string][]byte{"string": []byte(`"24 in"`), "object": []byte(`{"value":24,"unit":"in"}`)} {
		b.Run("unmarshal "+name, func(b *testing.B) {
			b.ReportAllocs()
			var l units.Length
			for b.Loop() {
				if err := json.Unmarshal(data, &l); err != nil {
					b.Fatal(err)
				}
			}
		})
	}
	b.Run("marshal measure", func(b *testing.B) {
		b.ReportAllocs()
		m := units.US.Express(units.Inch.Of(24).Amount())
		for b.Loop() {
			if _, err := json.Marshal(m); err != nil {
				b.Fatal(err)
			}
		}
	})
}
