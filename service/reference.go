package service

import (
	"bytes"
	"crypto/sha256"
	_ "embed"
	"encoding/hex"
	"encoding/json"
	"net/http"
	"time"

	"soffit.example/bars"
	"soffit.example/service/internal/wire"
	"soffit.example/units"
)

// openAPI is the description of the door, generated from the wire types.
//
//go:embed openapi.json
var openAPI []byte

// document is a reply that does not depend on the request.
type document struct {
	media  string
	policy string // Content-Security-Policy, if not that of all replies
	etag   string
	body   []byte
}

func newDocument(media string, body []byte) *document {
	sum := sha256.Sum256(body)
	return &document{media: media, etag: `"` + hex.EncodeToString(sum[:16]) + `"`, body: body}
}

// serve answers with the document, or with 304 to who has it already.
func (d *document) serve(w http.ResponseWriter, r *http.Request) error {
	h := w.Header()
	h.Set("Content-Type", d.media)
	h.Set("ETag", d.etag)
	h.Set("Cache-Control", "no-cache") // may be kept, and is asked for again by its tag
	if d.policy != "" {
		h.Set("Content-Security-Policy", d.policy)
	}
	http.ServeContent(w, r, "", time.Time{}, bytes.NewReader(d.body))
	return nil
}

// publish makes the documents, by path.
func (s *Service) publish() (map[string]*document, error) {
	docs := map[string]*document{
		"/openapi.json": newDocument("application/json", openAPI),
	}
	add := func(path string, v any) error {
		data, err := encode(v)
		docs[path] = newDocument("application/json", data)
		return err
	}
	var list wire.Catalogs
	for _, c := range bars.Catalogs() {
		list.Catalogs = append(list.Catalogs, wire.CatalogLine{ID: c.ID(), Title: c.Title(), Sizes: sizeNames(c)})
		if err := add(catalogRoot+c.ID(), catalogOf(c)); err != nil {
			return nil, err
		}
	}
	if err := add("/v1/bars", list); err != nil {
		return nil, err
	}
	if err := add("/v1/codes", s.codeList()); err != nil {
		return nil, err
	}
	if err := add("/v1/units", unitList()); err != nil {
		return nil, err
	}
	page, err := s.page()
	if err != nil {
		return nil, err
	}
	docs["/"] = page
	return docs, nil
}

// catalogRoot is the path of the bar catalogs, each by its id.
const catalogRoot = "/v1/bars/"

// catalog answers GET /v1/bars/{catalog}.
func (s *Service) catalog(w http.ResponseWriter, r *http.Request) error {
	id := r.PathValue("catalog")
	if d, ok := s.documents[catalogRoot+id]; ok {
		return d.serve(w, r)
	}
	return &problem{kind: notFound, detail: unknownName("", "catalog", clip(id), catalogIDs()).Detail}
}

func catalogIDs() []string {
	var ids []string
	for _, c := range bars.Catalogs() {
		ids = append(ids, c.ID())
	}
	return ids
}

func catalogOf(c bars.Catalog) wire.Catalog {
	w := wire.Catalog{
		ID: c.ID(), Title: c.Title(), Sources: orEmpty(c.Sources()), Provenance: c.Provenance(),
		Sizes: make([]wire.Size, c.Len()), Grades: []wire.Grade{},
	}
	for i, s := range c.Sizes() {
		size := wire.Size{
			Name: s.Name, Diameter: asPrinted(s.PrintedDiameter()), Area: asPrinted(s.PrintedArea()), Mass: asPrinted(s.PrintedMass()),
			Bends: []wire.BendOf{},
		}
		if p := s.PrintedOverall(); p.Text != "" {
			m := asPrinted(p)
			size.Overall = &m
		}
		for _, use := range []struct {
			name string
			use  bars.Use
		}{{"main", bars.Main}, {"stirrup", bars.Stirrup}} {
			if b, err := s.Bend(use.use); err == nil {
				inside := units.SI.ExpressIn(b.Inside.Amount(), s.PrintedDiameter().Unit)
				size.Bends = append(size.Bends, wire.BendOf{Use: use.name, Inside: inside, Source: b.Source})
			}
		}
		w.Sizes[i] = size
	}
	for _, g := range c.Grades() {
		first, last := g.Range()
		w.Grades = append(w.Grades, wire.Grade{Name: g.Name, Yield: asPrinted(g.Printed()), From: first.Name, To: last.Name, Source: g.Source})
	}
	return w
}

// asPrinted keeps the number of a standard to its last digit.
func asPrinted(p bars.Printed) units.Measure {
	return units.Measure{Number: json.Number(p.Value.String()), Unit: p.Unit}
}

func (s *Service) codeList() wire.Codes {
	var w wire.Codes
	for _, c := range s.codes {
		e := c.Edition()
		w.Codes = append(w.Codes, wire.Code{ID: e.ID, Title: e.Title, Year: e.Year, ReportIn: e.System, Scope: orEmpty(e.Scope), Cautions: orEmpty(c.Cautions())})
	}
	return w
}

func unitList() wire.Units {
	var w wire.Units
	var current *wire.Dimension
	for _, row := range units.Table() {
		if name := row.Dimension.String(); current == nil || current.Name != name {
			w.Dimensions = append(w.Dimensions, wire.Dimension{
				Name:   name,
				Prints: wire.Prints{SI: units.SI.Unit(row.Dimension), US: units.US.Unit(row.Dimension)},
			})
			current = &w.Dimensions[len(w.Dimensions)-1]
		}
		current.Units = append(current.Units, wire.Unit{Symbol: row.Symbol, Name: row.Name, Aliases: orEmpty(row.Aliases), Factor: row.Factor, UCUM: row.UCUM})
	}
	return w
}
