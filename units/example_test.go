package units_test

import (
	"encoding/json"
	"errors"
	"fmt"

	"soffit.example/units"
)

// The flexural strength of a singly reinforced rectangle, A_s f_y (d - a/2).
func Example() {
	var (
		width = units.Inch.Of(16)
		depth = units.Inch.Of(23.5)
		steel = units.SquareInch.Of(3.16)
		fy    = units.KSI.Of(60)
		fc    = units.PSI.Of(4500)
	)
	tension := fy.MulArea(steel)
	block := tension.DivStress(fc.Scale(0.85)).DivLength(width)
	strength := tension.MulLength(depth.Sub(block.Scale(0.5)))

	fmt.Printf("a  = %.3f in\n", block.In(units.Inch))
	fmt.Printf("Mn = %.1f kip-ft = %.1f kN-m\n", strength.In(units.KipFoot), strength.In(units.KilonewtonMetre))
	// Output:
	// a  = 3.098 in
	// Mn = 346.8 kip-ft = 470.2 kN-m
}

func ExampleParseLength() {
	for _, text := range []string{"24 in", "26 ft 6 in", "1 1/2 in", "350 mm"} {
		l, err := units.ParseLength(text)
		if err != nil {
			fmt.Println(err)
			continue
		}
		fmt.Println(units.Inch.Format(l))
	}
	// Output:
	// 24 in
	// 318 in
	// 1.5 in
	// 13.7795275591 in
}

func ExampleParseError() {
	_, err := units.ParseLength("24")
	fmt.Println("width", err)
	_, err = units.ParseLength("24 ksi")
	fmt.Println("width", err)

	var pe *units.ParseError
	if errors.As(err, &pe) {
		fmt.Println(pe.Text, "|", pe.Dimension, "|", pe.Accepted)
	}
	// Output:
	// width needs a unit, e.g. "14 in" or "350 mm"
	// width has the unit "ksi", which is of stress; units of length are m, mm, cm, in or ft
	// 24 ksi | length | [m mm cm in ft]
}

func ExampleLength_UnmarshalJSON() {
	var section struct{ Width, Depth units.Length }
	err := json.Unmarshal([]byte(`{"width": "16 in", "depth": {"value": 650, "unit": "mm"}}`), &section)
	fmt.Println(units.Inch.Format(section.Width), units.Millimetre.Format(section.Depth), err)

	err = json.Unmarshal([]byte(`{"width": 16}`), &section)
	fmt.Println("width", err)
	// Output:
	// 16 in 650 mm <nil>
	// width needs a unit, e.g. "14 in" or "350 mm"
}

func ExampleSystem_Format() {
	moment := units.KipFoot.Of(250).Amount()
	fmt.Println(units.US.Format(moment))
	fmt.Println(units.SI.Format(moment))
	fmt.Println(units.US.FormatIn(moment, "kip-in"))
	// Output:
	// 250 kip-ft
	// 338.954487083 kN-m
	// 3000 kip-in
}

func ExampleSystem_Express() {
	reply, err := json.Marshal(map[string]any{
		"width":       units.US.Express(units.Inch.Of(0.75).Amount()),
		"utilization": units.US.Express(units.Plain(0.87)),
		"moments":     units.SeriesOf(units.US, []units.Moment{units.KipFoot.Of(0), units.KipFoot.Of(120.5)}),
	})
	fmt.Println(string(reply), err)
	// Output:
	// {"moments":{"unit":"kip-ft","values":[0,120.5]},"utilization":0.87,"width":{"value":0.75,"unit":"in"}} <nil>
}

func ExampleAtMost() {
	// Ten gaps of a tenth of an inch against a limit of one inch.
	sum := 0.0
	for range 10 {
		sum += 0.1 * 25.4
	}
	fmt.Println(units.AtMost(sum, 25.4), units.AtMost(25.5, 25.4))
	// Output: true false
}

func ExampleAmount() {
	capacities := []units.Amount{units.KipFoot.Of(312).Amount(), units.Kip.Of(74).Amount()}
	demands := []units.Amount{units.KipFoot.Of(250).Amount(), units.Kip.Of(45).Amount()}
	for i, demand := range demands {
		utilization, ok := demand.Ratio(capacities[i])
		fmt.Printf("%s: %.2f %t\n", demand.Dimension(), utilization, ok)
	}
	// Output:
	// moment: 0.80 true
	// force: 0.61 true
}

func ExampleTable() {
	for _, row := range units.Table() {
		if row.Dimension == units.DimStress {
			fmt.Printf("%s = %s %s, %s %v\n", row.Symbol, row.Factor, row.SIUnit, row.UCUM, row.Aliases)
		}
	}
	// Output:
	// Pa = 1 Pa, Pa []
	// kPa = 1000 Pa, kPa []
	// MPa = 1000000 Pa, MPa [N/mm2]
	// GPa = 1000000000 Pa, GPa []
	// psi = 4.4482216152605/0.00064516 Pa, [psi] []
	// ksi = 4448.2216152605/0.00064516 Pa, 10*3.[psi] []
}
