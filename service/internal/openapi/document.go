// Package openapi builds the OpenAPI 3.1 document of the JSON door from the
// wire types. It runs when the document is generated and in tests; the service
// embeds the result and links nothing of this.
package openapi

import (
	"context"
	"encoding/json"
	"fmt"
	"net/http"
	"strconv"

	"github.com/getkin/kin-openapi/openapi3"

	"soffit.example/service/internal/wire"
)

// version of the door: it changes with the contract, not with the engine.
const version = "1.1.0"

// door is one operation.
type door struct {
	method, path, id, summary, description string
	request, reply                         any // zero values of wire types; nil: no body
	media                                  string
	parameter                              string
	statuses                               []int // beyond those that every door may give
}

func doors() []door {
	post := []int{400, 406, 408, 413, 415, 422, 429, 503}
	return []door{
		{method: "POST", path: "/v1/designs", id: "design", request: wire.Brief{}, reply: wire.Design{}, statuses: post,
			summary:     "Design a beam",
			description: "Finds bars and stirrups that carry the beam and fit. A beam for which nothing fits, and one that the method does not cover, are answers with status 200: see verdict. Safe to repeat."},
		{method: "POST", path: "/v1/checks", id: "check", request: wire.CheckRequest{}, reply: wire.Design{}, statuses: post,
			summary:     "Check a layout",
			description: "Judges a layout with the same checks that a design passes. A layout that fails is an answer with status 200. Safe to repeat."},
		{method: "POST", path: "/v1/strengths", id: "strengths", request: wire.StrengthsRequest{}, reply: wire.Strengths{}, statuses: post,
			summary:     "Strengths of a section",
			description: "Flexure, shear and torsion strengths of a bare section with every intermediate value. Safe to repeat."},
		{method: "POST", path: "/v1/fits", id: "fit", request: wire.FitsRequest{}, reply: wire.Fits{}, statuses: post,
			summary:     "How bars lie in a stirrup",
			description: "Coordinates, clear distances against those required, least width. Safe to repeat."},
		{method: "GET", path: "/v1/codes", id: "codes", reply: wire.Codes{}, summary: "Design codes offered", description: "Cacheable by its ETag."},
		{method: "GET", path: "/v1/bars", id: "catalogs", reply: wire.Catalogs{}, summary: "Bar catalogs", description: "Cacheable by its ETag."},
		{method: "GET", path: "/v1/bars/{catalog}", id: "catalog", reply: wire.Catalog{}, parameter: "catalog", summary: "One bar catalog",
			description: "Values as the standard prints them. Cacheable by its ETag.", statuses: []int{404}},
		{method: "GET", path: "/v1/units", id: "units", reply: wire.Units{}, summary: "Units that are read", description: "Cacheable by its ETag."},
		{method: "GET", path: "/openapi.json", id: "openapi", reply: map[string]any{}, summary: "This document", description: "Cacheable by its ETag."},
		{method: "GET", path: "/", id: "page", media: "text/html", reply: "", summary: "A page for people", description: "The doors, and what the problems mean."},
		{method: "GET", path: "/healthz", id: "health", reply: wire.Health{}, summary: "Whether the service is alive"},
		{method: "GET", path: "/readyz", id: "ready", reply: wire.Health{}, summary: "Whether the service should be sent requests",
			description: "503 once it is stopping."},
	}
}

// Document is the whole document.
func Document() (*openapi3.T, error) {
	b := newBuilder()
	doc := &openapi3.T{
		OpenAPI: "3.1.0",
		Info: &openapi3.Info{
			Title:   "Soffit",
			Version: version,
			Description: "Designs and checks reinforced-concrete beams. Quantities carry their units: \"24 in\", or " +
				"{\"value\": 24, \"unit\": \"in\"}; a bare number is refused. The same request gives the same reply to the byte. " +
				"Results are a calculation aid for qualified engineers and defer to the locally adopted code and to the licensed engineer who seals the work.",
		},
		Servers:  openapi3.Servers{{URL: "/"}},
		Paths:    openapi3.NewPaths(),
		Security: openapi3.SecurityRequirements{},
	}
	problem := b.ref(wire.Problem{})
	for _, d := range doors() {
		op := &openapi3.Operation{OperationID: d.id, Summary: d.summary, Description: d.description, Responses: openapi3.NewResponses()}
		op.Responses.Delete("default")
		if d.request != nil {
			op.RequestBody = &openapi3.RequestBodyRef{Value: openapi3.NewRequestBody().WithRequired(true).
				WithContent(openapi3.NewContentWithJSONSchemaRef(b.ref(d.request)))}
		}
		if d.parameter != "" {
			op.Parameters = openapi3.Parameters{{Value: openapi3.NewPathParameter(d.parameter).WithDescription("Id of the catalog.").WithSchema(openapi3.NewStringSchema())}}
		}
		op.Responses.Set("200", &openapi3.ResponseRef{Value: openapi3.NewResponse().WithDescription("The answer.").WithContent(b.content(d))})
		if d.id == "ready" {
			op.Responses.Set("503", &openapi3.ResponseRef{Value: openapi3.NewResponse().WithDescription("Stopping.").WithContent(b.content(d))})
		}
		for _, status := range append(append([]int(nil), d.statuses...), 403, 421, 500) {
			r := openapi3.NewResponse().WithDescription(http.StatusText(status)).WithContent(openapi3.Content{"application/problem+json": {Schema: problem}})
			if status == 429 || status == 503 {
				r.Headers = openapi3.Headers{"Retry-After": {Value: &openapi3.Header{Parameter: openapi3.Parameter{
					Description: "Seconds to wait.", Schema: openapi3.NewIntegerSchema().NewRef()}}}}
			}
			op.Responses.Set(strconv.Itoa(status), &openapi3.ResponseRef{Value: r})
		}
		doc.AddOperation(d.path, d.method, op)
	}
	if b.err != nil {
		return nil, fmt.Errorf("openapi: %w", b.err)
	}
	doc.Components = &openapi3.Components{Schemas: b.schemas}
	return doc, nil
}

func (b *builder) content(d door) openapi3.Content {
	switch d.reply.(type) {
	case string:
		return openapi3.Content{d.media: {Schema: openapi3.NewStringSchema().NewRef()}}
	case map[string]any:
		return openapi3.NewContentWithJSONSchema(openapi3.NewObjectSchema())
	}
	return openapi3.NewContentWithJSONSchemaRef(b.ref(d.reply))
}

// JSON is the document as it is published: valid, indented, and the same
// bytes every time.
func JSON() ([]byte, error) {
	doc, err := Document()
	if err != nil {
		return nil, err
	}
	data, err := json.MarshalIndent(doc, "", "  ")
	if err != nil {
		return nil, fmt.Errorf("openapi: %w", err)
	}
	data = append(data, '\n')
	loaded, err := openapi3.NewLoader().LoadFromData(data)
	if err != nil {
		return nil, fmt.Errorf("openapi: reading the document back: %w", err)
	}
	if err := loaded.Validate(context.Background()); err != nil {
		return nil, fmt.Errorf("openapi: the document is not valid: %w", err)
	}
	return data, nil
}
