package bars

import (
	"fmt"

	"github.com/shopspring/decimal"

	"soffit.example/units"
)

// Size is one bar size. It is a plain value, cheap to copy and comparable;
// the zero Size means "no bar". Sizes normally come from a [Catalog]; a Size
// made by hand needs a name, a diameter and an area, and has no printed
// values and no bend rules.
type Size struct {
	Name    string // "#8", "No. 25", "25", "25M", "N24"
	Catalog string // id of the catalog it comes from
	Number  int    // of the mark: 8 of "#8", 25 of "25M"
	Order   int    // 0 for the smallest of its catalog; neighbours differ by 1

	Diameter units.Length // nominal
	// Overall is the diameter over the ribs, approximate by nature, or zero
	// where the catalog does not know it.
	Overall       units.Length
	Area          units.Area // nominal: the design value, not pi d2/4
	MassPerLength units.MassPerLength

	rec     *record
	bundled uint8 // bars in contact that it stands for; 0: a single one
}

// record is what a catalog keeps of a size beyond its quantities. A bundle
// has the record of its bar.
type record struct {
	bar                           nominal
	diameter, area, mass, overall Printed
	microArea                     int64 // area in millionths of a mm2, exact
	rules                         [uses]rule
}

// nominal holds the quantities of a single bar.
type nominal struct {
	diameter, overall units.Length
	area              units.Area
	mass              units.MassPerLength
}

// Printed is a number as a standard prints it.
type Printed struct {
	Text  string // "1.00": trailing zeros kept; empty where nothing is printed
	Unit  string // "in2"
	Value decimal.Decimal
}

// String is the number with its unit, "1.00 in2".
func (p Printed) String() string {
	if p.Text == "" {
		return ""
	}
	return p.Text + " " + p.Unit
}

// times is n times p, with its number of decimals.
func (p Printed) times(n int) Printed {
	if p.Text == "" || n == 1 {
		return p
	}
	p.Value = p.Value.Mul(decimal.NewFromInt(int64(n)))
	p.Text = p.Value.StringFixed(max(0, -p.Value.Exponent()))
	return p
}

// IsZero reports whether s is the zero Size, no bar at all.
func (s Size) IsZero() bool { return s == Size{} }

// String is the name of the size.
func (s Size) String() string { return s.Name }

// Mass of a bar of this size and the given length.
func (s Size) Mass(length units.Length) units.Mass { return s.MassPerLength.MulLength(length) }

// PrintedDiameter is the nominal diameter as the standard prints it; empty
// for a bundle, whose diameter no standard prints.
func (s Size) PrintedDiameter() Printed { return s.printed().diameter }

// PrintedArea is the nominal area as the standard prints it, times the number
// of bars of a bundle.
func (s Size) PrintedArea() Printed { return s.printed().area.times(s.Bundled()) }

// PrintedMass is the nominal mass per length as the standard prints it, times
// the number of bars of a bundle.
func (s Size) PrintedMass() Printed { return s.printed().mass.times(s.Bundled()) }

// PrintedOverall is the diameter over the ribs as its source prints it; empty
// where it is not known.
func (s Size) PrintedOverall() Printed { return s.printed().overall }

func (s Size) printed() record {
	if s.rec == nil {
		return record{}
	}
	r := *s.rec
	if s.bundled > 1 {
		r.diameter, r.overall = Printed{}, Printed{}
	}
	return r
}

// Check reports what makes s unusable as a bar: a diameter outside
// 0 < d <= 1 m or an area outside 0 < A <= 1 m2.
func (s Size) Check() error {
	if d := s.Diameter.In(units.Metre); !(d > 0 && d <= maxDiameter) {
		return &RangeError{Field: "size.diameter", Value: s.Diameter.String(), Allowed: "more than 0 m, at most 1 m"}
	}
	if a := s.Area.In(units.SquareMetre); !(a > 0 && a <= maxDiameter*maxDiameter) {
		return &RangeError{Field: "size.area", Value: s.Area.String(), Allowed: "more than 0 m2, at most 1 m2"}
	}
	return nil
}

const maxDiameter = 1 // m; a guard against absurd input, not a rule

// Group is a number of bars of one size.
type Group struct {
	Size  Size
	Count int
}

// String is the group as a drawing notes it, "4 #9".
func (g Group) String() string { return fmt.Sprintf("%d %s", g.Count, g.Size.Name) }

// PrintedArea is count times the printed area, in the unit of the catalog and
// with its number of decimals: 4 bars of 1.27 in2 are "5.08 in2".
func (g Group) PrintedArea() Printed {
	return g.Size.PrintedArea().times(g.Count)
}

// TotalArea is the nominal area of all groups. Catalogue areas are added as
// decimals (fixed-point, to a millionth of a mm2, which holds every printed
// area exactly) and rounded to a float once. It allocates nothing.
func TotalArea(groups ...Group) units.Area {
	var sum areaSum
	for i := range groups {
		sum.add(&groups[i].Size, groups[i].Count)
	}
	return sum.area()
}

// microPerSquareMetre is the number of millionths of a mm2 in a m2.
const microPerSquareMetre = 1e12

// areaSum adds areas exactly where a catalog knows them exactly, and as
// floats for bars made by hand or in numbers that would overflow.
type areaSum struct {
	micro int64
	loose float64 // m2
}

func (a *areaSum) add(s *Size, count int) {
	// No catalogue bar or bundle exceeds 1 m2, so a product stays below 2^60.
	const most = 1_000_000
	if s.rec != nil && count >= 0 && count <= most && a.micro < 1<<62 {
		a.micro += int64(count*s.Bundled()) * s.rec.microArea
		return
	}
	a.loose += float64(count) * s.Area.In(units.SquareMetre)
}

func (a *areaSum) area() units.Area {
	return units.SquareMetre.Of(float64(a.micro)/microPerSquareMetre + a.loose)
}
