package service_test

import (
	"bytes"
	"context"
	"flag"
	"fmt"
	"io"
	"net/http"
	"net/http/httptest"
	"os"
	"path/filepath"
	"strings"
	"testing"

	"github.com/getkin/kin-openapi/openapi3"
	"github.com/getkin/kin-openapi/openapi3filter"
	"github.com/getkin/kin-openapi/routers"
	"github.com/getkin/kin-openapi/routers/legacy"
	"github.com/go-json-experiment/json/jsontext"
	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/service"
	"soffit.example/service/internal/openapi"
	"soffit.example/service/internal/wire"
)

var update = flag.Bool("update", false, "write what is found to the golden files")

func TestThePublishedDocumentIsFresh(t *testing.T) {
	want, err := openapi.JSON()
	require.NoError(t, err)
	w := send(newService(t), "GET", "/openapi.json", "")
	require.True(t, bytes.Equal(want, w.Body.Bytes()), "openapi.json is stale: go generate ./service")
}

// contract holds requests and replies against the published document.
type contract struct{ router routers.Router }

func newContract(t testing.TB, s *service.Service) contract {
	doc, err := openapi3.NewLoader().LoadFromData(send(s, "GET", "/openapi.json", "").Body.Bytes())
	require.NoError(t, err)
	require.NoError(t, doc.Validate(context.Background()))
	router, err := legacy.NewRouter(doc)
	require.NoError(t, err)
	return contract{router}
}

// request reports what the document has against a request.
func (c contract) request(method, path, body string) (*openapi3filter.RequestValidationInput, error) {
	r := httptest.NewRequest(method, path, strings.NewReader(body))
	if body != "" {
		r.Header.Set("Content-Type", "application/json")
	}
	route, params, err := c.router.FindRoute(r)
	if err != nil {
		return nil, err
	}
	in := &openapi3filter.RequestValidationInput{Request: r, PathParams: params, Route: route}
	return in, openapi3filter.ValidateRequest(context.Background(), in)
}

// reply reports what the document has against a reply.
func (c contract) reply(in *openapi3filter.RequestValidationInput, w *httptest.ResponseRecorder) error {
	return openapi3filter.ValidateResponse(context.Background(), &openapi3filter.ResponseValidationInput{
		RequestValidationInput: in, Status: w.Code, Header: w.Header(), Body: io.NopCloser(bytes.NewReader(w.Body.Bytes())),
		Options: &openapi3filter.Options{IncludeResponseStatus: true},
	})
}

// A golden file holds a request line, the body after it, and after a line
// that begins with === the status, the media type and the body of the reply.
func TestGolden(t *testing.T) {
	s := newService(t)
	c := newContract(t, s)
	files, err := filepath.Glob("testdata/http/*.http")
	require.NoError(t, err)
	require.NotEmpty(t, files)
	for _, file := range files {
		t.Run(strings.TrimSuffix(filepath.Base(file), ".http"), func(t *testing.T) {
			data, err := os.ReadFile(file)
			require.NoError(t, err)
			request, want, _ := strings.Cut(string(data), "\n=== ")
			line, body, _ := strings.Cut(request, "\n")
			method, path, ok := strings.Cut(line, " ")
			require.True(t, ok, "first line: method and path")
			body = strings.TrimSpace(body)

			w := send(s, method, path, body)
			reply := jsontext.Value(bytes.Clone(w.Body.Bytes())) // Indent writes into it
			require.NoError(t, reply.Indent(jsontext.WithIndent(" ")))
			got := fmt.Sprintf("%d %s\n%s\n", w.Code, w.Header().Get("Content-Type"), reply)

			in, err := c.request(method, path, body)
			if w.Code == http.StatusOK {
				require.NoError(t, err, "the document refuses a request that the service takes")
			}
			require.NotNil(t, in)
			require.NoError(t, c.reply(in, w))

			if *update {
				require.NoError(t, os.WriteFile(file, []byte(request+"\n=== "+got), 0o644))
				return
			}
			require.Equal(t, want, got)
		})
	}
}

func TestEveryReplyKeepsToTheDocument(t *testing.T) {
	s := newService(t)
	c := newContract(t, s)
	for _, r := range soundRequests() {
		full := strings.Replace(r.body, `{`, `{"detail": "full",`, 1)
		for _, body := range []string{r.body, full, `{}`, `[]`, `{`, strings.Replace(r.body, "ACI 318-19", "ACI 318-14", 1)} {
			in, _ := c.request("POST", r.path, body)
			require.NoError(t, c.reply(in, send(s, "POST", r.path, body)), "%s %.200s", r.path, body)
		}
	}
	for _, path := range []string{"/v1/bars", "/v1/bars/astm-inch", "/v1/bars/as-nzs-4671", "/v1/bars/none", "/v1/codes", "/v1/units", "/openapi.json", "/healthz", "/readyz"} {
		in, err := c.request("GET", path, "")
		require.NoError(t, err)
		require.NoError(t, c.reply(in, send(s, "GET", path, "")), path)
	}
}

// What the document refuses the service refuses too: nothing gets in that is
// not described. And where the document accepts, a refusal names a fault that
// no schema can express.
func TestDocumentAndServiceAgreeOnStructure(t *testing.T) {
	s := newService(t)
	c := newContract(t, s)
	wrong := []string{`null`, `7`, `-1`, `2.5`, `true`, `"x"`, `""`, `[]`, `{}`, `[null]`, `{"value": 1}`, `{"value": 1, "unit": "in"}`, `"1 in"`, `"1 kip"`, `"none"`}
	requests := soundRequests()
	rapid.Check(t, func(t *rapid.T) {
		r := rapid.SampledFrom(requests).Draw(t, "request")
		path, body := r.path, mutate(t, r.body, wrong)
		in, refused := c.request("POST", path, body)
		w := send(s, "POST", path, body)
		require.NoError(t, c.reply(in, w), body)
		require.NotEqual(t, http.StatusInternalServerError, w.Code, body)
		if refused != nil {
			require.GreaterOrEqual(t, w.Code, 400, "accepted although the document refuses it: %v\n%s", refused, body)
			return
		}
		if w.Code == http.StatusOK {
			return
		}
		require.Equal(t, http.StatusUnprocessableEntity, w.Code, body)
		for _, e := range decode[wire.Problem](t, w).Errors {
			for _, structural := range []string{"is not a member here", "is null", "it must be text", "it must be a list", "it must be an object"} {
				require.NotContains(t, e.Detail, structural, "the document accepts what is structurally wrong: %s", body)
			}
		}
	})
}

// mutate changes one token-sized part of a request: a value for another, a
// member's name, or a member left out.
func mutate(t *rapid.T, body string, wrong []string) string {
	type span struct{ from, to int }
	var values, names []span
	dec := jsontext.NewDecoder(strings.NewReader(body))
	for dec.PeekKind() != 0 {
		kind, n := dec.StackIndex(dec.StackDepth())
		name := kind == '{' && n%2 == 0 && dec.PeekKind() == '"'
		token, err := dec.ReadToken()
		if err != nil {
			break
		}
		to := int(dec.InputOffset())
		from := to - len(token.String())
		if token.Kind() == '"' {
			from -= 2
		}
		switch {
		case name:
			names = append(names, span{from, to})
		case token.Kind() == '"' || token.Kind() == '0' || token.Kind() == 't' || token.Kind() == 'f':
			values = append(values, span{from, to})
		}
	}
	if rapid.Bool().Draw(t, "rename") {
		at := rapid.SampledFrom(names).Draw(t, "name")
		return body[:at.from] + `"` + rapid.SampledFrom([]string{"x", "unit", "Width", "cod"}).Draw(t, "to") + `"` + body[at.to:]
	}
	at := rapid.SampledFrom(values).Draw(t, "value")
	return body[:at.from] + rapid.SampledFrom(wrong).Draw(t, "with") + body[at.to:]
}
