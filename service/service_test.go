package service_test

import (
	"encoding/json"
	"html"
	"net/http"
	"net/http/httptest"
	"os"
	"regexp"
	"slices"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
	"soffit.example/service"
	"soffit.example/service/internal/wire"
)

// codes are the design codes that the tests offer.
func codes() []beam.Code {
	var list []beam.Code
	for _, c := range aci318.Editions() {
		list = append(list, c)
	}
	return list
}

func newService(t testing.TB, change ...func(*service.Options)) *service.Service {
	o := service.Options{Codes: codes()}
	for _, c := range change {
		c(&o)
	}
	s, err := service.New(o)
	require.NoError(t, err)
	return s
}

// send asks a handler as a client on the same machine would.
func send(h http.Handler, method, path, body string, header ...string) *httptest.ResponseRecorder {
	r := httptest.NewRequest(method, path, strings.NewReader(body))
	r.Host = "127.0.0.1:8318"
	if body != "" {
		r.Header.Set("Content-Type", "application/json")
	}
	for i := 0; i+1 < len(header); i += 2 {
		switch header[i] {
		case "Host":
			r.Host = header[i+1]
		default:
			r.Header.Set(header[i], header[i+1])
		}
	}
	w := httptest.NewRecorder()
	h.ServeHTTP(w, r)
	return w
}

func decode[T any](t require.TestingT, w *httptest.ResponseRecorder) T {
	var v T
	require.NoError(t, json.Unmarshal(w.Body.Bytes(), &v), w.Body.String())
	return v
}

// problemOf reads a problem reply and checks what all of them share.
func problemOf(t require.TestingT, w *httptest.ResponseRecorder) wire.Problem {
	require.Equal(t, "application/problem+json", w.Header().Get("Content-Type"), w.Body.String())
	require.Equal(t, "no-store", w.Header().Get("Cache-Control"))
	p := decode[wire.Problem](t, w)
	require.Equal(t, w.Code, p.Status)
	require.True(t, strings.HasPrefix(p.Type, "/problems/"), p.Type)
	require.NotEmpty(t, p.Title)
	require.NotEmpty(t, p.Detail)
	return p
}

const goodBrief = `{
  "reference": "RB-3, records room",
  "code": "ACI 318-19",
  "section": {"shape": "rectangular", "width": "16 in", "depth": "26 in"},
  "concrete": {"strength": "4.5 ksi", "density": "150 lb/ft3", "aggregate": "3/4 in"},
  "reinforcement": {"catalog": "astm-inch", "yield": "60 ksi", "stirrup_yield": "60 ksi", "coating": "none"},
  "exposure": "interior",
  "spans": ["27 ft"],
  "supports": [{"kind": "pinned", "width": "12 in"}, {"kind": "roller", "width": "12 in"}],
  "loads": [
    {"case": "dead", "shape": "uniform", "intensity": "1.05 kip/ft"},
    {"case": "live", "shape": "uniform", "intensity": "1.4 kip/ft", "sustained": 0.5}
  ],
  "serviceability": {"attached": "fragile", "months": 60},
  "preferences": {"bars": ["#8", "#9"], "stirrups": ["#3"], "max_layers": 2, "prefer": "least-steel", "alternatives": 1}
}`

const goodDemands = `{
  "code": "ACI 318-19",
  "section": {"shape": "rectangular", "width": "16 in", "depth": "26 in"},
  "concrete": {"strength": "4.5 ksi"},
  "reinforcement": {"catalog": "astm-inch", "yield": "60 ksi"},
  "exposure": "interior",
  "demands": [{"name": "midspan", "moment": "300 kip-ft"}, {"name": "support", "shear": "45 kip"}],
  "preferences": {"bars": ["#8", "#9"], "stirrups": ["#3"], "alternatives": 1}
}`

const goodStrengths = `{"code": "ACI 318-19", "section": {"shape": "rectangular", "width": "16 in", "depth": "26 in"},
  "concrete": {"strength": "4.5 ksi"}, "bending": "positive",
  "layers": [{"area": "3.16 in2", "depth": "23.5 in", "yield": "60 ksi"}, {"area": "0.40 in2", "depth": "2.5 in", "yield": "60 ksi"}],
  "stirrups": {"area": "0.22 in2", "spacing": "9 in", "yield": "60 ksi", "cover": "1.5 in", "diameter": "0.375 in"},
  "demand": {"moment": "250 kip-ft", "shear": "45 kip", "torque": "0 kip-ft", "axial": "0 kip"}}`

const goodFits = `{"code": "ACI 318-19", "width": "16 in", "depth": "26 in", "cover": "1.5 in",
  "stirrup": {"catalog": "astm-inch", "size": "#4"}, "aggregate": "3/4 in",
  "layers": [{"size": "#9", "count": 4}, {"size": "#9", "count": 2}]}`

const goodLayout = `{
  "longitudinal": [{"bar": "#9", "count": 4, "face": "bottom", "layer": 1}, {"bar": "#5", "count": 2, "face": "top"}],
  "transverse": [{"bar": "#3", "legs": 2, "spacing": "9 in"}]}`

const goodCheck = `{"brief": ` + goodBrief + `, "layout": ` + goodLayout + `}`

// request is a request of a door that takes a document.
type request struct{ path, body string }

// soundRequests has sound requests of every door, of every shape among them.
func soundRequests() []request {
	var list []request
	for path, body := range goodRequests() {
		list = append(list, request{path, body})
		for _, section := range []string{tee, floorTee, ledges, box} {
			if other := of(body, section); other != body && (path != "/v1/strengths" || section != floorTee) {
				list = append(list, request{path, other})
			}
		}
	}
	slices.SortFunc(list, func(a, b request) int { return strings.Compare(a.path+a.body, b.path+b.body) })
	return list
}

// goodRequests has a sound request of every door.
func goodRequests() map[string]string {
	return map[string]string{
		"/v1/designs": goodBrief, "/v1/checks": goodCheck, "/v1/strengths": goodStrengths, "/v1/fits": goodFits,
	}
}

func TestEveryDoorAnswersASoundRequest(t *testing.T) {
	s := newService(t)
	for _, r := range soundRequests() {
		w := send(s, "POST", r.path, r.body)
		require.Equal(t, http.StatusOK, w.Code, "%s: %s\n%s", r.path, w.Body, r.body)
		require.Equal(t, "application/json", w.Header().Get("Content-Type"))
		require.Equal(t, "no-store", w.Header().Get("Cache-Control"))
		require.NotContains(t, w.Body.String(), "NaN")
	}
	require.Equal(t, http.StatusOK, send(s, "POST", "/v1/designs", goodDemands).Code)
}

// requestsOn lists the requests that a page tells its reader to send, by door.
func requestsOn(t *testing.T, page string) map[string][]string {
	sends := regexp.MustCompile(`(?s)http://127\.0\.0\.1:8318(/v1/\w+)[^\n]*-d '(.*?)'`)
	requests := make(map[string][]string)
	for _, m := range sends.FindAllStringSubmatch(html.UnescapeString(page), -1) {
		requests[m[1]] = append(requests[m[1]], m[2])
	}
	require.NotEmpty(t, requests)
	return requests
}

func TestWhatIsShownToReadersWorks(t *testing.T) {
	s := newService(t)
	readme, err := os.ReadFile("../README.md")
	require.NoError(t, err)
	for name, page := range map[string]string{"page": send(s, "GET", "/", "").Body.String(), "README": string(readme)} {
		requests := requestsOn(t, page)
		require.Contains(t, requests, "/v1/designs", name)
		require.Contains(t, requests, "/v1/strengths", name)
		require.Contains(t, requests, "/v1/checks", name)
		for path, bodies := range requests {
			for _, body := range bodies {
				w := send(s, "POST", path, body)
				require.Equal(t, http.StatusOK, w.Code, "%s: %s %s", name, path, w.Body)
				require.Equal(t, beam.Satisfied.String(), decode[struct{ Verdict string }](t, w).Verdict, "%s: %s", name, path)
			}
		}
	}
}

func TestADesignPassesItsOwnCheck(t *testing.T) {
	s := newService(t)
	for name, brief := range map[string]string{
		"member": goodBrief, "demands": goodDemands,
		"tee in a floor": of(goodBrief, floorTee), "inverted tee": of(goodBrief, ledges), "box": of(goodBrief, box),
		"hogging tee": strings.Replace(of(goodDemands, tee), `"300 kip-ft"`, `"-300 kip-ft"`, 1),
		"bundles":     strings.Replace(strings.Replace(goodBrief, `"max_layers": 2`, `"max_layers": 1, "bundles": 2`, 1), `"16 in"`, `"12 in"`, 1),
	} {
		t.Run(name, func(t *testing.T) {
			w := send(s, "POST", "/v1/designs", brief)
			require.Equal(t, http.StatusOK, w.Code, w.Body.String())
			design := decode[map[string]json.RawMessage](t, w)
			require.Equal(t, `"satisfied"`, string(design["verdict"]))

			w = send(s, "POST", "/v1/checks", `{"brief": `+brief+`, "layout": `+string(design["layout"])+`}`)
			require.Equal(t, http.StatusOK, w.Code, w.Body.String())
			check := decode[map[string]json.RawMessage](t, w)
			require.Equal(t, `"satisfied"`, string(check["verdict"]))
			require.JSONEq(t, string(design["layout"]), string(check["layout"]))
			require.JSONEq(t, string(design["checks"]), string(check["checks"]))
		})
	}
}

// Every member of a layout is echoed, and the echo is taken as the layout.
func TestALayoutGoesRound(t *testing.T) {
	const layout = `{
  "longitudinal": [
    {"mark": "B1", "bar": "#8", "count": 4, "face": "bottom", "layer": 1, "bundled": 2, "yield": "80 ksi"},
    {"mark": "B2", "bar": "#6", "count": 2, "face": "bottom", "layer": 2},
    {"mark": "W1", "bar": "#4", "count": 1, "face": "side", "spacing": "6 in"},
    {"mark": "T1", "bar": "#6", "count": 2, "face": "top", "layer": 1},
    {"mark": "T2", "bar": "#5", "count": 4, "face": "top", "flange": true, "spacing": "5 in", "yield": "60 ksi"}
  ],
  "transverse": [
    {"mark": "S1", "bar": "#3", "legs": 4, "spacing": "7 in", "from": "6 in", "to": "13.5 ft", "form": "open", "angle": 60},
    {"mark": "S2", "bar": "#4", "legs": 2, "spacing": "9 in", "from": "13.5 ft", "to": "26.5 ft"}
  ],
  "bent": [{"mark": "D1", "bar": "#7", "count": 2, "span": 1, "at": "4 ft", "angle": 45, "rises": "left", "bends": 2, "spacing": "11 in"}]
}`
	s := newService(t)
	check := func(layout string) map[string]json.RawMessage {
		w := send(s, "POST", "/v1/checks", `{"brief": `+of(goodBrief, floorTee)+`, "layout": `+layout+`}`)
		require.Equal(t, http.StatusOK, w.Code, w.Body.String())
		return decode[map[string]json.RawMessage](t, w)
	}
	first := check(layout)
	echo := string(first["layout"])
	for _, member := range []string{
		`"bundled":2`, `"yield":{"value":80,"unit":"ksi"}`, `"flange":true`, `"spacing":{"value":5,"unit":"in"}`, `"angle":60`, `"form":"open"`,
		`"at":{"value":4,"unit":"ft"}`, `"rises":"left"`, `"bends":2`,
	} {
		require.Contains(t, echo, member)
	}
	second := check(echo)
	require.JSONEq(t, echo, string(second["layout"]))
	require.JSONEq(t, string(first["checks"]), string(second["checks"]))
	require.JSONEq(t, string(first["bars"]), string(second["bars"]))
}

// A list of a layout that is left out is empty.
func TestALayoutNeedNotListWhatItHasNone(t *testing.T) {
	s := newService(t)
	bare := strings.Replace(goodCheck, `,
  "transverse": [{"bar": "#3", "legs": 2, "spacing": "9 in"}]`, "", 1)
	said := strings.Replace(bare, `"longitudinal":`, `"transverse": [], "bent": [], "longitudinal":`, 1)
	require.NotEqual(t, goodCheck, bare)
	out := func(body string) map[string]json.RawMessage {
		w := send(s, "POST", "/v1/checks", body)
		require.Equal(t, http.StatusOK, w.Code, w.Body.String())
		reply := decode[map[string]json.RawMessage](t, w)
		delete(reply, "input_hash")
		return reply
	}
	got := out(bare)
	require.Equal(t, `"unsatisfied"`, string(got["verdict"]))
	require.Equal(t, out(said), got)
}

func TestReportInChangesUnitsAlone(t *testing.T) {
	s := newService(t)
	us := decode[wire.Strengths](t, send(s, "POST", "/v1/strengths", goodStrengths))
	si := decode[wire.Strengths](t, send(s, "POST", "/v1/strengths", strings.Replace(goodStrengths, `{"code"`, `{"report_in": "si", "code"`, 1)))
	require.Equal(t, "kip-ft", us.Flexure.Nominal.Unit)
	require.Equal(t, "kN-m", si.Flexure.Nominal.Unit)
	inUS, err := us.Flexure.Nominal.Number.Float64()
	require.NoError(t, err)
	inSI, err := si.Flexure.Nominal.Number.Float64()
	require.NoError(t, err)
	// 1 kip-ft = 4.4482216152605 kN x 0.3048 m (NIST SP 811, appendix B.8).
	require.InEpsilon(t, inUS*4.4482216152605*0.3048, inSI, 1e-11)
	require.Equal(t, us.Verdict, si.Verdict)
	require.Equal(t, us.Flexure.Phi, si.Flexure.Phi)
}

func TestInputHashIsThatOfTheRequestAsRead(t *testing.T) {
	s := newService(t)
	hash := func(body string) string {
		w := send(s, "POST", "/v1/fits", body)
		require.Equal(t, http.StatusOK, w.Code, w.Body.String())
		return decode[wire.Fits](t, w).InputHash
	}
	first := hash(goodFits)
	require.Regexp(t, `^sha256:[0-9a-f]{64}$`, first)
	require.Equal(t, first, hash(strings.ReplaceAll(goodFits, "\n", " ")))
	require.Equal(t, first, hash(strings.Replace(goodFits, `"16 in"`, `{"unit": "in", "value": 16.0}`, 1)))
	require.Equal(t, first, hash(strings.Replace(goodFits, `"3/4 in"`, `"0.75 in"`, 1)))
	require.NotEqual(t, first, hash(strings.Replace(goodFits, `"16 in"`, `"17 in"`, 1)))
}

func TestFullDetailShowsTheWorking(t *testing.T) {
	s := newService(t)
	brief := decode[wire.Design](t, send(s, "POST", "/v1/designs", goodBrief))
	full := decode[wire.Design](t, send(s, "POST", "/v1/designs", strings.Replace(goodBrief, `{`, `{"detail": "full",`, 1)))
	require.Len(t, full.Checks, len(brief.Checks))
	steps := 0
	for i, c := range full.Checks {
		require.Empty(t, brief.Checks[i].Working)
		for _, step := range c.Working {
			steps++
			require.NotEmpty(t, step.Symbol)
			require.NotEmpty(t, step.Meaning, step.Symbol)
		}
	}
	require.Greater(t, steps, 20)
}

func TestSameRequestSameBytes(t *testing.T) {
	a, b := newService(t), newService(t)
	for _, r := range soundRequests() {
		first := send(a, "POST", r.path, r.body).Body.String()
		require.Equal(t, first, send(a, "POST", r.path, r.body).Body.String(), r.path)
		require.Equal(t, first, send(b, "POST", r.path, r.body).Body.String(), r.path)
	}
}

func TestNewRefusesUnsuitableOptions(t *testing.T) {
	for name, o := range map[string]service.Options{
		"no code":        {},
		"twice the same": {Codes: append(codes(), codes()[0])},
		"negative limit": {Codes: codes(), Limits: service.Limits{Body: -1}},
	} {
		_, err := service.New(o)
		require.Error(t, err, name)
	}
}

// What the service itself takes is bounded by allocations, which do not
// depend on the machine: reading, converting, hashing and writing.
func TestTheServiceItselfIsCheap(t *testing.T) {
	s := newService(t)
	require.LessOrEqual(t, testing.AllocsPerRun(50, func() { send(s, "POST", "/v1/fits", goodFits) }), 400.0)
}
