package service

import (
	"bytes"
	"crypto/sha256"
	_ "embed"
	"encoding/base64"
	"fmt"
	"html/template"
	"net/http"
	"strings"

	"soffit.example/beam"
)

//go:embed page.html
var pageSource string

//go:embed page.css
var pageStyle string

// door is a row of the page for people.
type door struct{ Method, Path, Takes, Gives string }

func doors() []door {
	return []door{
		{"POST", "/v1/designs", "a brief", "bars and stirrups that carry the beam and fit, every check, every assumption, every reject"},
		{"POST", "/v1/checks", "a brief and a layout", "the same checks on that layout"},
		{"POST", "/v1/strengths", "a section and its steel, optional demands", "flexure, shear and torsion strengths with every intermediate value"},
		{"POST", "/v1/fits", "a form, a cover, a stirrup and bars", "how the bars lie: coordinates, clear distances, least width"},
		{"GET", "/v1/codes", "", "design codes offered"},
		{"GET", "/v1/bars", "", "bar catalogs; each under /v1/bars/ and its id"},
		{"GET", "/v1/units", "", "units that are read, with their exact factors"},
		{"GET", "/openapi.json", "", "the OpenAPI document of all this"},
		{"GET", "/healthz", "", "whether the service is alive"},
		{"GET", "/readyz", "", "whether it should be sent requests"},
	}
}

// shapeRow is a row of the page: the members of one shape of section or load.
type shapeRow struct{ Shape, Needs, May string }

// shapes lists the rules by shape; all admits what every shape may have.
func shapes[S interface {
	~uint8
	String() string
}](rules []rule, all string) (rows []shapeRow) {
	for i, r := range rules[1:] {
		rows = append(rows, shapeRow{S(i + 1).String(), listed(r.needs), listed(r.may + " " + all)})
	}
	return rows
}

// listed puts commas between the words of a list.
func listed(words string) string { return strings.Join(strings.Fields(words), ", ") }

// page is the page for people: the doors, and what the problems mean.
func (s *Service) page() (*document, error) {
	t, err := template.New("page").Parse(pageSource)
	if err != nil {
		return nil, fmt.Errorf("service: page: %w", err)
	}
	type entry struct {
		Name   string
		Status int
		Title  string
		About  string
	}
	var problems []entry
	for _, k := range kinds() {
		problems = append(problems, entry{k.name, k.status, k.title, k.about})
	}
	var b bytes.Buffer
	err = t.Execute(&b, map[string]any{
		"Style": template.CSS(pageStyle), "Version": beam.Version, "Doors": doors(), "Problems": problems, "Codes": s.codeList().Codes,
		"Shapes": shapes[beam.Shape](sectionRules[:], "joist"), "Loads": shapes[beam.LoadShape](loadRules[:], ""),
	})
	if err != nil {
		return nil, fmt.Errorf("service: page: %w", err)
	}
	d := newDocument("text/html; charset=utf-8", b.Bytes())
	sum := sha256.Sum256([]byte(pageStyle))
	d.policy = "default-src 'none'; style-src 'sha256-" + base64.StdEncoding.EncodeToString(sum[:]) + "'; frame-ancestors 'none'; base-uri 'none'; form-action 'none'"
	return d, nil
}

// problemKind leads the type of a problem to its description.
func (s *Service) problemKind(w http.ResponseWriter, r *http.Request) error {
	for _, k := range kinds() {
		if k.name == r.PathValue("kind") {
			http.Redirect(w, r, "/#problem-"+k.name, http.StatusFound)
			return nil
		}
	}
	return &problem{kind: notFound, detail: "there is no problem of this name"}
}
