package bars

import (
	"bytes"
	"encoding/json"
	"errors"
	"fmt"
	"io"
	"math"

	"github.com/shopspring/decimal"

	"soffit.example/units"
)

// catalogFile is the form of a catalog's data file. Numbers are text, so that
// they stay as printed.
type catalogFile struct {
	ID         string   `json:"id"`
	Title      string   `json:"title"`
	Sources    []string `json:"sources"`
	Provenance string   `json:"provenance"`
	Units      struct {
		Diameter string `json:"diameter"` // also of overall, inside_diameter, extension_least
		Area     string `json:"area"`
		Mass     string `json:"mass"`
		Yield    string `json:"yield"`
	} `json:"units"`
	Sizes []struct {
		Name     string `json:"name"`
		Number   int    `json:"number"`
		Diameter string `json:"diameter"`
		Area     string `json:"area"`
		Mass     string `json:"mass"`
		Overall  string `json:"overall"`
	} `json:"sizes"`
	Grades []struct {
		Name   string `json:"name"`
		Yield  string `json:"yield"`
		From   string `json:"from"`
		To     string `json:"to"`
		Source string `json:"source"`
	} `json:"grades"`
	Bends []bendFile `json:"bends"`
}

// bendFile is the bend rule of a range of sizes in one use. The inside
// diameter is either a multiple of the nominal diameter or a length.
type bendFile struct {
	Use             string     `json:"use"` // "main" or "stirrup"
	From            string     `json:"from"`
	To              string     `json:"to"`
	InsideDiameters string     `json:"inside_diameters"`
	InsideDiameter  string     `json:"inside_diameter"`
	Source          string     `json:"source"`
	Hooks           []hookFile `json:"hooks"`
}

// hookFile is the straight extension of a hook: a multiple of the nominal
// diameter, but at least a length.
type hookFile struct {
	Angle              int    `json:"angle"`
	ExtensionDiameters string `json:"extension_diameters"`
	ExtensionLeast     string `json:"extension_least"`
}

// Limits of a catalog file. They keep a hostile file small; standards stay
// far below them.
const (
	maxSizes      = 200
	maxNameBytes  = 60
	maxDecimalLen = 12
	maxDiameters  = 100 // of a bend or an extension, in bar diameters
)

// ParseCatalog reads a catalog from JSON in the form of the files in the
// package's data directory, so that a program can bring sizes of its own.
// Sizes stand in order of growing diameter; names are unique. It checks that
// area and mass belong to the diameter (a circle and 7850 kg/m3, within 5 %,
// as nominal values are rounded), which catches most misplaced columns.
func ParseCatalog(data []byte) (Catalog, error) {
	var f catalogFile
	d := json.NewDecoder(bytes.NewReader(data))
	d.DisallowUnknownFields()
	if err := d.Decode(&f); err != nil {
		return Catalog{}, fmt.Errorf("bars: reading catalog: %w", err)
	}
	if _, err := d.Token(); !errors.Is(err, io.EOF) {
		return Catalog{}, errors.New("bars: reading catalog: data after its end")
	}
	t, err := f.table()
	if err != nil {
		return Catalog{}, fmt.Errorf("bars: catalog %q: %w", f.ID, err)
	}
	return Catalog{t}, nil
}

func (f *catalogFile) table() (*table, error) {
	switch {
	case f.ID == "" || len(f.ID) > maxNameBytes:
		return nil, fmt.Errorf("id needs 1 to %d bytes", maxNameBytes)
	case len(f.Sources) == 0:
		return nil, errors.New("sources: name the standard")
	case len(f.Sizes) == 0 || len(f.Sizes) > maxSizes:
		return nil, fmt.Errorf("sizes: %d, allowed 1 to %d", len(f.Sizes), maxSizes)
	}
	t := &table{id: f.ID, title: f.Title, provenance: f.Provenance, sources: f.Sources}
	for i := range f.Sizes {
		s, err := f.size(i)
		if err == nil && i > 0 && !t.sizes[i-1].Diameter.Less(s.Diameter) {
			err = fmt.Errorf("diameter %s does not grow from %s", s.rec.diameter, t.sizes[i-1].rec.diameter)
		}
		if err == nil && t.find(s.Name) >= 0 {
			err = errors.New("name is taken")
		}
		if err != nil {
			return nil, fmt.Errorf("sizes[%d] %q: %w", i, f.Sizes[i].Name, err)
		}
		t.sizes = append(t.sizes, s)
		t.names = append(t.names, s.Name)
	}
	for i := range f.Grades {
		if err := f.grade(t, i); err != nil {
			return nil, fmt.Errorf("grades[%d] %q: %w", i, f.Grades[i].Name, err)
		}
	}
	for i := range f.Bends {
		if err := f.Bends[i].apply(t, f.Units.Diameter); err != nil {
			return nil, fmt.Errorf("bends[%d]: %w", i, err)
		}
	}
	return t, nil
}

func (t *table) find(name string) int {
	for i := range t.names {
		if t.names[i] == name {
			return i
		}
	}
	return -1
}

// span finds the sizes from one name to another, inclusive.
func (t *table) span(from, to string) (first, last int, err error) {
	first, last = t.find(from), t.find(to)
	switch {
	case first < 0:
		return 0, 0, fmt.Errorf("from: no size %q", from)
	case last < first:
		return 0, 0, fmt.Errorf("to: no size %q at or after %q", to, from)
	}
	return first, last, nil
}

func (f *catalogFile) size(i int) (Size, error) {
	row := &f.Sizes[i]
	if row.Name == "" || len(row.Name) > maxNameBytes {
		return Size{}, fmt.Errorf("name needs 1 to %d bytes", maxNameBytes)
	}
	s := Size{Name: row.Name, Catalog: f.ID, Number: row.Number, Order: i, rec: new(record)}
	var err error
	if s.Diameter, s.rec.diameter, err = printedLength(row.Diameter, f.Units.Diameter); err != nil {
		return Size{}, fmt.Errorf("diameter: %w", err)
	}
	area, printed, err := positive(units.DimArea, row.Area, f.Units.Area)
	if err != nil {
		return Size{}, fmt.Errorf("area: %w", err)
	}
	s.Area, _ = area.Area()
	s.rec.area = printed
	if s.rec.microArea, err = microArea(printed); err != nil {
		return Size{}, fmt.Errorf("area: %w", err)
	}
	mass, printed, err := positive(units.DimMassPerLength, row.Mass, f.Units.Mass)
	if err != nil {
		return Size{}, fmt.Errorf("mass: %w", err)
	}
	s.MassPerLength, _ = mass.MassPerLength()
	s.rec.mass = printed
	if row.Overall != "" {
		if s.Overall, s.rec.overall, err = printedLength(row.Overall, f.Units.Diameter); err != nil {
			return Size{}, fmt.Errorf("overall: %w", err)
		}
		if s.Overall.Less(s.Diameter) {
			return Size{}, fmt.Errorf("overall: %s is less than the diameter %s", s.rec.overall, s.rec.diameter)
		}
	}
	if err := s.Check(); err != nil {
		return Size{}, err
	}
	s.rec.bar = nominal{diameter: s.Diameter, overall: s.Overall, area: s.Area, mass: s.MassPerLength}
	return s, s.plausible()
}

// plausible compares area with diameter and mass with area.
func (s Size) plausible() error {
	const slack = 0.05
	const steel = 7850 // kg/m3, the density that nominal masses assume
	d, a := s.Diameter.In(units.Metre), s.Area.In(units.SquareMetre)
	if circle := math.Pi / 4 * d * d; math.Abs(a/circle-1) > slack {
		return fmt.Errorf("area %s is not that of diameter %s within 5 %%", s.rec.area, s.rec.diameter)
	}
	if m := s.MassPerLength.In(units.KilogramPerMetre); math.Abs(m/(a*steel)-1) > slack {
		return fmt.Errorf("mass %s is not that of area %s within 5 %%", s.rec.mass, s.rec.area)
	}
	return nil
}

func (f *catalogFile) grade(t *table, i int) error {
	row := &f.Grades[i]
	yield, printed, err := positive(units.DimStress, row.Yield, f.Units.Yield)
	if err != nil {
		return fmt.Errorf("yield: %w", err)
	}
	first, last, err := t.span(row.From, row.To)
	if err != nil {
		return err
	}
	g := Grade{Name: row.Name, Source: row.Source, printed: printed, first: t.sizes[first], last: t.sizes[last]}
	g.Yield, _ = yield.Stress()
	t.grades = append(t.grades, g)
	return nil
}

func (b *bendFile) apply(t *table, unit string) error {
	var use Use
	switch b.Use {
	case "main":
		use = Main
	case "stirrup":
		use = Stirrup
	default:
		return fmt.Errorf("use: %q, allowed: \"main\" or \"stirrup\"", b.Use)
	}
	first, last, err := t.span(b.From, b.To)
	if err != nil {
		return err
	}
	if (b.InsideDiameters == "") == (b.InsideDiameter == "") {
		return errors.New("give one of inside_diameters and inside_diameter")
	}
	for i := first; i <= last; i++ {
		s := &t.sizes[i]
		r := rule{bend: Bend{Bar: s.Diameter, Source: b.Source}}
		if b.InsideDiameters != "" {
			r.bend.Inside, err = multiple(b.InsideDiameters, s.Diameter)
		} else {
			r.bend.Inside, _, err = printedLength(b.InsideDiameter, unit)
		}
		if err != nil {
			return fmt.Errorf("inside diameter: %w", err)
		}
		for j, h := range b.Hooks {
			hook, err := h.hook(r.bend, unit)
			if err != nil {
				return fmt.Errorf("hooks[%d]: %w", j, err)
			}
			r.hooks = append(r.hooks, hook)
		}
		if s.rec.rules[use].bend != (Bend{}) {
			return fmt.Errorf("%s has two rules as a %s", s.Name, use)
		}
		s.rec.rules[use] = r
	}
	return nil
}

func (h *hookFile) hook(b Bend, unit string) (Hook, error) {
	if h.Angle != 90 && h.Angle != 135 && h.Angle != 180 {
		return Hook{}, fmt.Errorf("angle: %d, allowed: 90, 135 or 180 degrees", h.Angle)
	}
	extension, err := multiple(h.ExtensionDiameters, b.Bar)
	if err != nil {
		return Hook{}, fmt.Errorf("extension_diameters: %w", err)
	}
	if h.ExtensionLeast != "" {
		least, _, err := printedLength(h.ExtensionLeast, unit)
		if err != nil {
			return Hook{}, fmt.Errorf("extension_least: %w", err)
		}
		extension = extension.Max(least)
	}
	return Hook{Bend: b, Angle: h.Angle, Extension: extension}, nil
}

// multiple is text times a diameter.
func multiple(text string, diameter units.Length) (units.Length, error) {
	v, err := printedDecimal(text)
	if err != nil {
		return units.Length{}, err
	}
	k := v.InexactFloat64()
	if !(k > 0 && k <= maxDiameters) {
		return units.Length{}, fmt.Errorf("%s, allowed: more than 0, at most %d bar diameters", text, maxDiameters)
	}
	return diameter.Scale(k), nil
}

func printedLength(text, unit string) (units.Length, Printed, error) {
	a, p, err := positive(units.DimLength, text, unit)
	l, _ := a.Length()
	return l, p, err
}

// positive reads a printed number with the unit of its column.
func positive(dim units.Dimension, text, unit string) (units.Amount, Printed, error) {
	v, err := printedDecimal(text)
	if err != nil {
		return units.Amount{}, Printed{}, err
	}
	if !v.IsPositive() {
		return units.Amount{}, Printed{}, fmt.Errorf("%s %s, allowed: more than 0", text, unit)
	}
	a, err := units.AmountOf(dim, text, unit)
	if err != nil {
		return units.Amount{}, Printed{}, err
	}
	return a, Printed{Text: text, Unit: unit, Value: v}, nil
}

// printedDecimal reads digits with at most one decimal point: no sign, no
// exponent, nothing that a table of bars would not print.
func printedDecimal(text string) (decimal.Decimal, error) {
	points := 0
	for _, c := range []byte(text) {
		if c == '.' {
			points++
		} else if c < '0' || c > '9' {
			points = 2
		}
	}
	if text == "" || len(text) > maxDecimalLen || points > 1 {
		return decimal.Decimal{}, fmt.Errorf("%.20q is not a number of at most %d digits", text, maxDecimalLen)
	}
	return decimal.NewFromString(text)
}

// microArea is an area in millionths of a mm2. It must come out whole, so
// that sums of areas are exact.
func microArea(p Printed) (int64, error) {
	for _, row := range units.Table() {
		if row.Dimension != units.DimArea || row.Symbol != p.Unit {
			continue
		}
		factor, err := decimal.NewFromString(row.Factor)
		if err != nil {
			return 0, fmt.Errorf("unit %s: %w", p.Unit, err)
		}
		micro := p.Value.Mul(factor).Shift(12)
		if !micro.IsInteger() || micro.GreaterThan(decimal.NewFromInt(microPerSquareMetre)) {
			return 0, fmt.Errorf("%s is above 1 m2 or finer than a millionth of a mm2", p)
		}
		return micro.IntPart(), nil
	}
	return 0, fmt.Errorf("unit %q is not the symbol of an area unit", p.Unit)
}
