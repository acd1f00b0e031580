package service_test

import (
	"context"
	"io"
	"net/http"
	"net/http/httptest"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/beam/aci318"
	"soffit.example/beam/statics"
	"soffit.example/service"
	"soffit.example/units"
)

// libraryBrief is goodBrief as a Go program would write it.
func libraryBrief() beam.Brief {
	foot, load := units.Foot, units.KipPerFoot
	return beam.Brief{
		Reference:     "RB-3, records room",
		Section:       beam.Section{Shape: beam.Rectangular, Width: units.Inch.Of(16), Depth: units.Inch.Of(26)},
		Concrete:      beam.Concrete{Strength: units.KSI.Of(4.5), Density: units.PoundPerCubicFoot.Of(150), Aggregate: units.Inch.Of(0.75)},
		Reinforcement: beam.Reinforcement{Catalog: "astm-inch", Yield: units.KSI.Of(60), StirrupYield: units.KSI.Of(60), Coating: beam.Uncoated},
		Exposure:      beam.Interior,
		Spans:         []units.Length{foot.Of(27)},
		Supports:      []beam.Support{{Kind: statics.Pinned, Width: foot.Of(1)}, {Kind: statics.Roller, Width: foot.Of(1)}},
		Loads: []beam.Load{
			{Case: beam.Dead, Shape: beam.Uniform, Intensity: load.Of(1.05), Sustained: 1},
			{Case: beam.Live, Shape: beam.Uniform, Intensity: load.Of(1.4), Sustained: 0.5},
		},
		Serviceability: beam.Serviceability{Attached: beam.Fragile, Months: 60},
		Preferences: beam.Preferences{
			Bars: []string{"#8", "#9"}, Stirrups: []string{"#3"}, MaxLayers: 2, Prefer: beam.LeastSteel, KeepBest: 1,
		},
	}
}

// The door and the library give one answer.
func TestTheDoorAnswersAsTheLibrary(t *testing.T) {
	r, err := beam.Design(context.Background(), aci318.ACI31819(), libraryBrief())
	require.NoError(t, err)
	reply := send(newService(t), "POST", "/v1/designs", goodBrief)
	require.Equal(t, http.StatusOK, reply.Code)
	body := reply.Body.String()
	require.Contains(t, body, `"verdict":"`+r.Verdict.String()+`"`)
	require.Contains(t, body, `"governing":{"check":"`+r.Governing.ID+`"`)
	for _, c := range r.Checks {
		require.Contains(t, body, `"id":"`+c.ID+`"`)
	}
}

func BenchmarkDesign(b *testing.B) {
	brief, code := libraryBrief(), aci318.ACI31819()
	b.ReportAllocs()
	for b.Loop() {
		if _, err := beam.Design(context.Background(), code, brief); err != nil {
			b.Fatal(err)
		}
	}
}

// BenchmarkDesignByHandler is BenchmarkDesign with reading, converting,
// hashing and writing.
func BenchmarkDesignByHandler(b *testing.B) { byHandler(b, "/v1/designs", goodBrief) }

// BenchmarkFitsByHandler is a door that computes next to nothing: what the
// service itself costs.
func BenchmarkFitsByHandler(b *testing.B) { byHandler(b, "/v1/fits", goodFits) }

func byHandler(b *testing.B, path, body string) {
	s := newService(b)
	b.ReportAllocs()
	for b.Loop() {
		if w := send(s, "POST", path, body); w.Code != http.StatusOK {
			b.Fatal(w.Body)
		}
	}
}

// BenchmarkDesignOverHTTP adds a connection.
func BenchmarkDesignOverHTTP(b *testing.B) {
	server := httptest.NewServer(newService(b, func(o *service.Options) { o.Hosts = []string{"127.0.0.1"} }))
	defer server.Close()
	b.ReportAllocs()
	for b.Loop() {
		r, err := http.Post(server.URL+"/v1/designs", "application/json", strings.NewReader(goodBrief))
		if err != nil {
			b.Fatal(err)
		}
		if _, err := io.Copy(io.Discard, r.Body); err != nil || r.StatusCode != http.StatusOK {
			b.Fatal(r.Status, err)
		}
		r.Body.Close()
	}
}
