package strict_test

import (
	"strings"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/service/internal/strict"
	"soffit.example/units"
)

// sample has a member of every kind that requests are made of.
type sample struct {
	Name   string         `json:"name,omitzero" validate:"max=5"`
	Kind   *string        `json:"kind,omitzero" validate:"omitnil,oneof=round flat-topped"`
	Width  units.Length   `json:"width"`
	Cover  *units.Length  `json:"cover,omitzero"`
	Spans  []units.Length `json:"spans,omitzero" validate:"omitnil,min=1,max=4"`
	Layers []layer        `json:"layers" validate:"min=1,max=3,dive"`
	Sizes  []string       `json:"sizes,omitzero" validate:"omitnil,min=1,max=3,dive,max=4"`
	Loose  *bool          `json:"loose,omitzero"`
}

type layer struct {
	Count int      `json:"count" validate:"min=1,max=40"`
	Share *float64 `json:"share,omitzero" validate:"omitnil,min=0,max=1"`
}

var (
	limits = strict.Limits{Depth: 8, Values: 200}
	reader = strict.NewReader[sample](limits)
)

func read(t require.TestingT, document string) (sample, []strict.Fault) {
	faults := strict.Faults{Most: 20}
	v, err := reader.Read([]byte(document), &faults)
	require.NoError(t, err)
	return v, faults.All()
}

func TestReadKeepsWhatWasGiven(t *testing.T) {
	v, faults := read(t, `{"width": "14 in", "cover": {"value": 2, "unit": "in"},
		"spans": ["20 ft", "6 m"], "layers": [{"count": 3, "share": 0.5}], "kind": "round", "loose": false}`)
	require.Empty(t, faults)
	require.Equal(t, units.Inch.Of(14), v.Width)
	require.Equal(t, units.Inch.Of(2), *v.Cover)
	require.Equal(t, []units.Length{units.Foot.Of(20), units.Metre.Of(6)}, v.Spans)
	require.Equal(t, 3, v.Layers[0].Count)
	require.Equal(t, 0.5, *v.Layers[0].Share)
	require.Equal(t, "round", *v.Kind)
	require.False(t, *v.Loose)
}

func TestReadListsEveryFaultAtOnce(t *testing.T) {
	v, faults := read(t, `{"name": "toolong", "widht": 1, "kind": "flattopped", "cover": 14,
		"spans": ["20 ft", null, "6 kip", {"value": 3}], "layers": [{"count": 1.5}, {"count": 41, "share": 2}, {}],
		"sizes": [], "loose": "no"}`)
	length := "a length in m, mm, cm, in or ft"
	require.Equal(t, []strict.Fault{
		{Path: "/widht", Detail: `"widht" is not a member here; did you mean "width"?`, Allowed: "name, kind, width, cover, spans, layers, sizes, loose"},
		{Path: "/cover", Detail: `cover needs a unit, e.g. "14 in" or "350 mm" (given: 14)`, Allowed: length},
		{Path: "/spans/1", Detail: "spans item 2 is null; leave out what is not known", Allowed: length},
		{Path: "/spans/2", Detail: `spans item 3 has the unit "kip", which is of force; units of length are m, mm, cm, in or ft (given: "6 kip")`, Allowed: length},
		{Path: "/spans/3/unit", Detail: "unit is missing", Allowed: "m, mm, cm, in, ft"},
		{Path: "/layers/0/count", Detail: "count is 1.5; it must be a whole number written with digits alone", Allowed: "a whole number from 1 to 40"},
		{Path: "/layers/2/count", Detail: "count is missing", Allowed: "a whole number from 1 to 40"},
		{Path: "/loose", Detail: `loose is text ("no"); it must be true or false`, Allowed: "true or false"},
		{Path: "/width", Detail: "width is missing", Allowed: length},
		{Path: "/name", Detail: "name has 7 characters; it must be text of at most 5 characters", Allowed: "text of at most 5 characters"},
		{Path: "/kind", Detail: `kind is "flattopped"; it must be one of round, flat-topped; did you mean "flat-topped"?`, Allowed: "round, flat-topped"},
		{Path: "/layers/1/count", Detail: "count is 41; it must be a whole number from 1 to 40", Allowed: "a whole number from 1 to 40"},
		{Path: "/layers/1/share", Detail: "share is 2; it must be a number from 0 to 1", Allowed: "a number from 0 to 1"},
		{Path: "/sizes", Detail: "sizes has 0 items; it must be a list of 1 to 3 items", Allowed: "a list of 1 to 3 items"},
	}, faults)
	// What was in order is there all the same, at its place.
	require.Equal(t, units.Foot.Of(20), v.Spans[0])
	require.Len(t, v.Spans, 4)
	require.Equal(t, 41, v.Layers[1].Count)
}

func TestFaults(t *testing.T) {
	good := func(member string) string {
		return `{"width": "14 in", "layers": [{"count": 1}]` + member + `}`
	}
	for name, tc := range map[string]struct {
		document, path, detail string
	}{
		"not an object":        {`[]`, "", "the request is a list; it must be an object"},
		"text at the top":      {`"x"`, "", `the request is text ("x"); it must be an object`},
		"null at the top":      {`null`, "", "the request is null"},
		"object for text":      {good(`, "name": {"a": [1, {"b": 2}]}`), "/name", "name is an object; it must be text"},
		"list for quantity":    {good(`, "cover": ["2 in"]`), "/cover", "cover is a list; it must be a length"},
		"true for quantity":    {good(`, "cover": true`), "/cover", "cover must be an object"},
		"long number":          {`{"width": "1 in", "layers": [{"count": 1, "share": 0.` + strings.Repeat("1", 60) + `}]}`, "/layers/0/share", "share is a number of 62 characters; at most 40 are read"},
		"number out of range":  {`{"width": "1 in", "layers": [{"count": 1, "share": 1e999}]}`, "/layers/0/share", "share is 1e999, which is out of range"},
		"whole out of range":   {`{"width": "1 in", "layers": [{"count": 99999999999}]}`, "/layers/0/count", "count is 99999999999"},
		"negative zero":        {`{"width": "1 in", "layers": [{"count": -0}]}`, "/layers/0/count", "count is 0; it must be a whole number from 1 to 40"},
		"unknown in a measure": {good(`, "cover": {"value": 1, "unit": "in", "units": "in"}`), "/cover/units", `"units" is not a member here; did you mean "unit"?`},
		"text value":           {good(`, "cover": {"value": "1", "unit": "in"}`), "/cover/value", `value is text ("1"); it must be a number`},
		"unknown unit":         {good(`, "cover": {"value": 1, "unit": "inch"}`), "/cover", "cover has the unknown unit \"inch\""},
		"item too long":        {good(`, "sizes": ["#8", "number 8"]`), "/sizes/1", "sizes item 2 has 8 characters; it must be text of at most 4 characters"},
		"escaped name":         {good(`, "a/b~c": 1`), "/a~1b~0c", `"a/b~c" is not a member here`},
		"case of a name":       {good(`, "Cover": "1 in"`), "/Cover", `"Cover" is not a member here; did you mean "cover"?`},
		"missing unit":         {good(`, "cover": {"value": 1}`), "/cover/unit", "unit is missing"},
	} {
		t.Run(name, func(t *testing.T) {
			_, faults := read(t, tc.document)
			require.Len(t, faults, 1, "%v", faults)
			require.Equal(t, tc.path, faults[0].Path)
			require.Contains(t, faults[0].Detail, tc.detail)
			require.Less(t, len(faults[0].Detail), 300)
		})
	}
}

func TestSyntaxErrors(t *testing.T) {
	for name, tc := range map[string]struct{ document, path, reason string }{
		"empty":           {"", "", "the document is empty"},
		"blank":           {" \n", "", "the document is empty"},
		"cut short":       {`{"width": "14 in"`, "", "the document ends before it is complete"},
		"twice":           {`{"width": "14 in", "width": "15 in"}`, "/width", `the member "width" is given twice`},
		"twice, escaped":  {`{"width": "14 in", "wid\u0074h": "15 in"}`, "/width", `the member "width" is given twice`},
		"twice, unknown":  {`{"x": {"a": 1, "a": 2}}`, "/x/a", `the member "a" is given twice`},
		"trailing value":  {`{} {}`, "", "the document goes on after its value"},
		"trailing text":   {`{} x`, "", "the document goes on after its value"},
		"bare NaN":        {`{"width": NaN}`, "/width", "the document is not JSON"},
		"leading zero":    {`{"layers": [{"count": 01}]}`, "/layers/0", "the document is not JSON"},
		"comment":         {`{/* */}`, "", "the document is not JSON"},
		"byte order mark": {"\ufeff{}", "", "the document is not JSON"},
		"not UTF-8":       {"{\"name\": \"\xff\"}", "/name", "the document is not JSON"},
		"lone surrogate":  {`{"name": "\ud800"}`, "/name", "the document is not JSON"},
		"too deep":        {`{"x": ` + strings.Repeat("[", 50) + strings.Repeat("]", 50) + `}`, "", "the document is nested deeper than 8 levels"},
		"endless name":    {`{"` + strings.Repeat("n", 500) + `": 1}`, "", "a member has a name of 500 bytes; at most 128 are read"},
		"too many":        {`{"spans": [` + strings.Repeat(`"1 m",`, 300) + `"1 m"]}`, "/spans/197", "the document has more than 200 names and values"},
	} {
		t.Run(name, func(t *testing.T) {
			faults := strict.Faults{Most: 20}
			_, err := reader.Read([]byte(tc.document), &faults)
			var syntax *strict.SyntaxError
			require.ErrorAs(t, err, &syntax)
			require.Contains(t, syntax.Reason, tc.reason)
			require.Equal(t, tc.path, syntax.Path)
		})
	}
}

func TestFaultsAreCountedBeyondTheLimit(t *testing.T) {
	faults := strict.Faults{Most: 2}
	for _, path := range []string{"/a", "/a/b", "/ab", "/c", "/d"} {
		faults.Add(strict.Fault{Path: path})
	}
	require.Equal(t, []strict.Fault{{Path: "/a"}, {Path: "/ab"}, {Detail: "2 further faults are not listed"}}, faults.All())
	require.False(t, faults.None())
}

func TestNearest(t *testing.T) {
	known := []string{"width", "depth", "stirrup_yield", "max_layers", "from"}
	for given, want := range map[string]string{
		"widht": "width", "Width": "width", "stirrupYield": "stirrup_yield", "max-layers": "max_layers",
		"dept": "depth", "from_position": "from", "colour": "", "x": "", strings.Repeat("w", 1000): "",
	} {
		require.Equal(t, want, strict.Nearest(given, known), given)
	}
}

// Whatever a document is, reading it ends without a panic, and the value that
// comes out has passed its rules unless there are faults.
func FuzzRead(f *testing.F) {
	for _, seed := range []string{
		`{"width": "14 in", "layers": [{"count": 3, "share": 0.5}]}`,
		`{"width": {"value": 1e3, "unit": "mm"}, "spans": ["26 ft 6 in"], "layers": [{"count": 1}], "sizes": ["#8"]}`,
		`{"widht": 1, "layers": null, "width": "１４ in"}`, `[[[[[[[[[[[[`, `{"a":{"a":{"a":1}}}`, `{"width":"14 in"}{}`,
	} {
		f.Add([]byte(seed))
	}
	f.Fuzz(func(t *testing.T, document []byte) {
		faults := strict.Faults{Most: 20}
		v, err := reader.Read(document, &faults)
		var syntax *strict.SyntaxError
		if err != nil {
			require.ErrorAs(t, err, &syntax)
			require.NotEmpty(t, syntax.Reason)
			return
		}
		for _, fault := range faults.All() {
			require.NotEmpty(t, fault.Detail)
		}
		if faults.None() {
			require.True(t, v.Width.IsFinite())
			require.NotEmpty(t, v.Layers)
			for _, l := range v.Layers {
				require.True(t, l.Count >= 1 && l.Count <= 40)
			}
		}
	})
}

// A document that is faulty in one place has exactly that fault, wherever it
// is.
func TestOneFaultIsFoundAtItsPlace(t *testing.T) {
	rapid.Check(t, func(t *rapid.T) {
		n := rapid.IntRange(1, 3).Draw(t, "layers")
		bad := rapid.IntRange(0, n-1).Draw(t, "bad")
		wrong := rapid.SampledFrom([]string{`0`, `41`, `"3"`, `null`, `2.5`, `[]`, `{}`, `true`, `1e99`}).Draw(t, "wrong")
		var b strings.Builder
		b.WriteString(`{"width": "14 in", "layers": [`)
		for i := range n {
			if i > 0 {
				b.WriteByte(',')
			}
			count := "4"
			if i == bad {
				count = wrong
			}
			b.WriteString(`{"count": ` + count + `}`)
		}
		b.WriteString(`]}`)
		_, faults := read(t, b.String())
		require.Len(t, faults, 1)
		require.Equal(t, "/layers/"+string(rune('0'+bad))+"/count", faults[0].Path)
	})
}

func BenchmarkRead(b *testing.B) {
	document := []byte(`{"width": "14 in", "cover": {"value": 2, "unit": "in"},
		"spans": ["20 ft", "6 m"], "layers": [{"count": 3, "share": 0.5}, {"count": 3}], "kind": "round", "loose": false, "sizes": ["#8", "#9"]}`)
	b.ReportAllocs()
	for b.Loop() {
		faults := strict.Faults{Most: 20}
		if _, err := reader.Read(document, &faults); err != nil || !faults.None() {
			b.Fatal(err, faults.All())
		}
	}
}
