package bars

import (
	"embed"
	"slices"
	"sync"

	"soffit.example/units"
)

// Catalog is a standard table of bar sizes. It is a small immutable value;
// the zero Catalog is empty. Two values from [Lookup] with the same id are
// equal.
type Catalog struct{ t *table }

type table struct {
	id, title, provenance string
	sources               []string
	sizes                 []Size
	names                 []string
	grades                []Grade
}

// Grade is a strength grade offered in a range of sizes of a catalog.
type Grade struct {
	Name   string       // "A615 Grade 60"
	Yield  units.Stress // specified yield strength
	Source string       // standard, and whether it was entered from memory

	printed     Printed
	first, last Size
}

// Printed is the yield strength as the standard prints it.
func (g Grade) Printed() Printed { return g.printed }

// Range is the smallest and the largest size of the grade.
func (g Grade) Range() (first, last Size) { return g.first, g.last }

// Offers reports whether the grade is made in size s of the same catalog.
func (g Grade) Offers(s Size) bool {
	return s.rec != nil && s.Catalog == g.first.Catalog && s.Order >= g.first.Order && s.Order <= g.last.Order
}

//go:embed data/*.json
var dataFiles embed.FS

// embedded lists the catalogs that come with the package, in the order in
// which Catalogs returns them; each is data/<id>.json.
var embedded = [...]string{"astm-inch", "astm-metric", "en-10080", "csa-g30-18", "as-nzs-4671"}

// loaded reads the data files on first use. They are part of the program and
// the tests read each of them, so a fault in one is a bug: it panics.
var loaded = sync.OnceValue(func() []Catalog {
	catalogs := make([]Catalog, 0, len(embedded))
	for _, id := range embedded {
		data, err := dataFiles.ReadFile("data/" + id + ".json")
		if err != nil {
			panic("bars: " + err.Error())
		}
		c, err := ParseCatalog(data)
		if err != nil {
			panic("bars: data/" + id + ".json: " + err.Error())
		}
		catalogs = append(catalogs, c)
	}
	return catalogs
})

// Catalogs lists the embedded catalogs, always in the same order: astm-inch,
// astm-metric, en-10080, csa-g30-18, as-nzs-4671. The caller owns the slice.
func Catalogs() []Catalog { return slices.Clone(loaded()) }

// Lookup finds an embedded catalog by its id. The error is an
// *[UnknownError] that names the nearest known id.
func Lookup(id string) (Catalog, error) {
	for _, c := range loaded() {
		if c.t.id == id {
			return c, nil
		}
	}
	return Catalog{}, unknown("catalog", "", id, slices.Clone(embedded[:]))
}

// read is the table of c, also of a zero Catalog.
func (c Catalog) read() *table {
	if c.t == nil {
		return &table{}
	}
	return c.t
}

// IsZero reports whether c is the zero Catalog.
func (c Catalog) IsZero() bool { return c.t == nil }

// ID is the identifier of the catalog, such as "astm-inch".
func (c Catalog) ID() string { return c.read().id }

// Title describes the catalog in a line.
func (c Catalog) Title() string { return c.read().title }

// Sources lists the standards whose values the catalog holds.
func (c Catalog) Sources() []string { return slices.Clone(c.read().sources) }

// Provenance says how the values came into the catalog: which were entered
// from memory, and what is left out.
func (c Catalog) Provenance() string { return c.read().provenance }

// Len is the number of sizes.
func (c Catalog) Len() int { return len(c.read().sizes) }

// At is the size of an order, 0 <= order < c.Len(). It panics outside that
// range, as an index does.
func (c Catalog) At(order int) Size { return c.read().sizes[order] }

// Sizes lists the sizes from the smallest to the largest. The caller owns the
// slice.
func (c Catalog) Sizes() []Size { return slices.Clone(c.read().sizes) }

// Size finds a size by its exact name. The error is an *[UnknownError] that
// names the nearest known size.
func (c Catalog) Size(name string) (Size, error) {
	t := c.read()
	if i := slices.Index(t.names, name); i >= 0 {
		return t.sizes[i], nil
	}
	return Size{}, unknown("size", t.id, name, slices.Clone(t.names))
}

// Grades lists the grades. The caller owns the slice.
func (c Catalog) Grades() []Grade { return slices.Clone(c.read().grades) }

// Grade finds a grade by its exact name. The error is an *[UnknownError] that
// names the nearest known grade.
func (c Catalog) Grade(name string) (Grade, error) {
	t := c.read()
	known := make([]string, len(t.grades))
	for i, g := range t.grades {
		if g.Name == name {
			return g, nil
		}
		known[i] = g.Name
	}
	return Grade{}, unknown("grade", t.id, name, known)
}
