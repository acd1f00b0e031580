package beam

import (
	"github.com/shopspring/decimal"

	"soffit.example/bars"
	"soffit.example/units"
)

// unitLength is what the quantities of demands given directly are for: a metre
// or a foot.
func unitLength(sys units.System) units.Length {
	if sys == units.US {
		return units.Foot.Of(1)
	}
	return units.Metre.Of(1)
}

// unitShare is how much of the search's masses, which are per metre with
// demands, goes to the quantities' length.
func (p *Problem) unitShare() float64 {
	if len(p.Brief.Spans) > 0 {
		return 1
	}
	return unitLength(p.System).In(units.Metre)
}

// takeOff counts the bars of a finished trial: masses by decimals from the
// catalogue's printed mass per length, so that the schedule's lines add up
// to the last digit.
func (r *Result) takeOff(t *Trial) {
	length := t.length()
	q := &r.Quantities
	q.PerLength = length.IsZero()
	if q.PerLength {
		length = unitLength(r.System)
	}
	massUnit, lengthUnit, printed := units.Kilogram, units.Metre, "kg"
	if r.System == units.US {
		massUnit, lengthUnit, printed = units.PoundMass, units.Foot, "lb"
	}
	line := func(mark, bar, shape string, count int, cut units.Length) units.Mass {
		size, err := t.Catalog.Size(bar)
		if err != nil {
			return units.Mass{}
		}
		perLength := size.PrintedMass().Value
		if per := size.PrintedMass().Unit; per != printed+"/"+lengthUnit.String() {
			perLength = decimal.NewFromFloat(size.MassPerLength.MulLength(lengthUnit.Of(1)).In(massUnit)).Round(6)
		}
		mass := decimal.NewFromInt(int64(count)).Mul(decimal.NewFromFloat(cut.In(lengthUnit)).Round(6)).Mul(perLength).Round(3)
		r.Schedule = append(r.Schedule, ScheduleLine{Mark: mark, Bar: bar, Count: count, Shape: shape, Length: cut, Mass: mass, MassUnit: printed})
		return massUnit.Of(mass.InexactFloat64())
	}
	for _, row := range r.Layout.Longitudinal {
		count := row.Count
		if row.Face == Side {
			count *= 2
		}
		q.SteelMass = q.SteelMass.Add(line(row.Mark, row.Bar, "straight", count, length))
	}
	for i := range t.Zones {
		z := &t.Zones[i]
		count := z.Count
		if q.PerLength {
			count = stirrupCount(Zone{To: length, Spacing: z.Spacing})
		}
		m := line(z.Mark, z.Bar, z.form().String()+" stirrup, 135-degree hooks", count, t.stirrupLength(t.ZoneBar[i], z))
		q.StirrupMass, q.SteelMass = q.StirrupMass.Add(m), q.SteelMass.Add(m)
	}
	for i := range t.Bent {
		b := &t.Bent[i]
		m := line(b.Mark, b.Bar, "slope of a bent bar, its straight parts not counted", b.Count*b.Bends, t.slope(i))
		q.SteelMass = q.SteelMass.Add(m)
	}
	q.Concrete = t.Geometry.Gross.MulLength(length)
	q.Form = t.Geometry.Form.MulLength(length)
	q.SteelPerConcrete = q.SteelMass.DivVolume(q.Concrete)
}

// slope is the length of bar across the web of the i-th bent bars, between the
// levels at which bars of their size would rest inside the stirrups; zero where
// there is no room between them.
func (t *Trial) slope(i int) units.Length {
	inside := t.Cover.Add(t.Stirrup.Diameter).Scale(2).Add(t.BentBar[i].Diameter)
	rise := t.Brief.Section.Depth.Sub(inside).Max(units.Length{})
	length, _, err := bars.Incline(rise, t.Bent[i].Angle)
	if err != nil {
		return units.Length{}
	}
	return length
}
