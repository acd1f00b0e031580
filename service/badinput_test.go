package service_test

import (
	"net/http"
	"slices"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/service/internal/wire"
)

// badInput is a sound request with one thing changed for the worse.
type badInput struct {
	name          string
	request       string // a sound request
	replace, with string // of it
	status        int    // 0: 422
	pointer       string
	detail        string // part of it
	allowed       string // part of it
}

func onBrief() []badInput {
	return []badInput{
		// Quantities.
		{name: "bare number", replace: `"16 in"`, with: `16`, pointer: "/section/width", detail: `width needs a unit, e.g. "14 in" or "350 mm" (given: 16)`, allowed: "a length in m, mm, cm, in or ft"},
		{name: "bare number as text", replace: `"16 in"`, with: `"16"`, pointer: "/section/width", detail: `width needs a unit`, allowed: "a length in"},
		{name: "wrong dimension", replace: `"16 in"`, with: `"16 kip"`, pointer: "/section/width", detail: `has the unit "kip"`, allowed: "a length in"},
		{name: "wrong dimension, object", replace: `"16 in"`, with: `{"value": 16, "unit": "psi"}`, pointer: "/section/width", detail: `has the unit "psi"`, allowed: "a length in"},
		{name: "area load for line load", replace: `"1.05 kip/ft"`, with: `"50 psf"`, pointer: "/loads/0/intensity", detail: `has the unit "psf"`, allowed: "a line load in"},
		{name: "unknown unit", replace: `"16 in"`, with: `"16 inches"`, pointer: "/section/width", detail: `unknown unit "inches"`, allowed: "m, mm, cm, in or ft"},
		{name: "unit in other case", replace: `"16 in"`, with: `"16 IN"`, pointer: "/section/width", detail: "case-sensitive", allowed: "a length in"},
		{name: "unit alone", replace: `"16 in"`, with: `"in"`, pointer: "/section/width", detail: "does not begin with a number", allowed: "a length in"},
		{name: "empty text", replace: `"16 in"`, with: `""`, pointer: "/section/width", detail: "width is empty", allowed: "a length in"},
		{name: "full-width digits", replace: `"16 in"`, with: `"１６ in"`, pointer: "/section/width", detail: "plain ASCII", allowed: "a length in"},
		{name: "minus sign of print", replace: `"16 in"`, with: "\"\u221216 in\"", pointer: "/section/width", detail: "plain ASCII", allowed: "a length in"},
		{name: "NaN text", replace: `"16 in"`, with: `"NaN in"`, pointer: "/section/width", detail: "does not begin with a number", allowed: "a length in"},
		{name: "infinity text", replace: `"16 in"`, with: `"Inf in"`, pointer: "/section/width", detail: "does not begin with a number", allowed: "a length in"},
		{name: "hexadecimal", replace: `"16 in"`, with: `"0x10 in"`, pointer: "/section/width", detail: "width", allowed: "a length in"},
		{name: "thousands comma", replace: `"4.5 ksi"`, with: `"4,500 psi"`, pointer: "/concrete/strength", detail: `has "," in its number`, allowed: "a stress in"},
		{name: "decimal comma", replace: `"4.5 ksi"`, with: `"4,5 ksi"`, pointer: "/concrete/strength", detail: `has "," in its number`, allowed: "a stress in"},
		{name: "huge exponent", replace: `"16 in"`, with: `"1e999999999 in"`, pointer: "/section/width", detail: "exponent", allowed: "a length in"},
		{name: "endless digits", replace: `"16 in"`, with: `"` + strings.Repeat("1", 60) + ` in"`, pointer: "/section/width", detail: "number of more than 40 characters", allowed: "a length in"},
		{name: "endless text", replace: `"16 in"`, with: `"` + strings.Repeat(" ", 5000) + `"`, pointer: "/section/width", detail: "at most 64 are read", allowed: "a length in"},
		{name: "endless number in object", replace: `"16 in"`, with: `{"value": 0.` + strings.Repeat("1", 60) + `, "unit": "in"}`, pointer: "/section/width/value", detail: "is a number of 62 characters; at most 40 are read"},
		{name: "fraction over zero", replace: `"3/4 in"`, with: `"3/0 in"`, pointer: "/concrete/aggregate", detail: "fraction over zero", allowed: "a length in"},
		{name: "object without unit", replace: `"16 in"`, with: `{"value": 16}`, pointer: "/section/width/unit", detail: "unit is missing", allowed: "m, mm, cm, in, ft"},
		{name: "object without value", replace: `"16 in"`, with: `{"unit": "in"}`, pointer: "/section/width/value", detail: "value is missing", allowed: "a number"},
		{name: "object with text value", replace: `"16 in"`, with: `{"value": "16", "unit": "in"}`, pointer: "/section/width/value", detail: `value is text ("16"); it must be a number`, allowed: "a number"},
		{name: "object with more", replace: `"16 in"`, with: `{"value": 16, "unit": "in", "note": "x"}`, pointer: "/section/width/note", detail: `"note" is not a member here`, allowed: "value, unit"},
		{name: "list for quantity", replace: `"16 in"`, with: `["16 in"]`, pointer: "/section/width", detail: "width is a list", allowed: "a length in"},
		{name: "true for quantity", replace: `"16 in"`, with: `true`, pointer: "/section/width", detail: "width must be", allowed: "a length in"},
		{name: "zero width", replace: `"16 in"`, with: `"0 in"`, pointer: "/section/width", detail: "width is 0", allowed: "in to"},
		{name: "negative width", replace: `"16 in"`, with: `"-16 in"`, pointer: "/section/width", detail: "width is -16 in", allowed: "in to"},
		{name: "huge width", replace: `"16 in"`, with: `"16 m"`, pointer: "/section/width", detail: "width is", allowed: "in to"},
		{name: "tiny depth", replace: `"26 in"`, with: `"26 mm"`, pointer: "/section/depth", detail: "depth is 1.02362204724 in", allowed: "in to"},
		{name: "strength a thousandfold", replace: `"4.5 ksi"`, with: `"4500 ksi"`, pointer: "/concrete/strength", detail: "4500 ksi", allowed: "ksi to"},
		{name: "strength in psi taken for ksi", replace: `"4.5 ksi"`, with: `"4.5 psi"`, pointer: "/concrete/strength", detail: "0.0045 ksi", allowed: "ksi to"},
		{name: "absurd yield", replace: `"yield": "60 ksi"`, with: `"yield": "60 psi"`, pointer: "/reinforcement/yield", detail: "0.06 ksi", allowed: "ksi to"},
		{name: "density of a feather", replace: `"150 lb/ft3"`, with: `"1.5 lb/ft3"`, pointer: "/concrete/density", detail: "1.5 lb/ft3", allowed: "lb/ft3 to"},
		{name: "zero density", replace: `"150 lb/ft3"`, with: `"0 lb/ft3"`, pointer: "/concrete/density", detail: "it must be above zero", allowed: "above zero"},
		{name: "negative aggregate", replace: `"3/4 in"`, with: `"-3/4 in"`, pointer: "/concrete/aggregate", detail: "it must be above zero", allowed: "above zero"},
		{name: "zero cover", replace: `"exposure": "interior"`, with: `"cover": "0 in"`, pointer: "/cover", detail: "cover is 0 in; it must be above zero", allowed: "above zero"},
		{name: "cover of half the beam", replace: `"exposure": "interior"`, with: `"cover": "8 in"`, pointer: "/cover", detail: "cover is 8 in", allowed: "half the smaller side"},
		{name: "negative support width", replace: `"kind": "pinned", "width": "12 in"`, with: `"kind": "pinned", "width": "-12 in"`, pointer: "/supports/0/width", detail: "-12 in", allowed: "0 in to"},
		{name: "support wider than the span", replace: `"kind": "roller", "width": "12 in"`, with: `"kind": "roller", "width": "20 ft"`, pointer: "/supports/1/width", detail: "240 in", allowed: "0 in to 162 in"},
		{name: "span of a bridge", replace: `"27 ft"`, with: `"27 km"`, pointer: "/spans/0", detail: `unknown unit "km"`, allowed: "a length in"},
		{name: "span too long", replace: `"27 ft"`, with: `"2700 ft"`, pointer: "/spans/0", detail: "32400 in", allowed: "in to"},

		// Members.
		{name: "unknown member", replace: `"width": "16 in"`, with: `"widht": "16 in", "width": "16 in"`, pointer: "/section/widht", detail: `"widht" is not a member here; did you mean "width"?`, allowed: "shape, width, web_width, depth"},
		{name: "unknown member at the top", replace: `"exposure"`, with: `"exposures"`, pointer: "/exposures", detail: `did you mean "exposure"?`, allowed: "reference, code"},
		{name: "member of another case", replace: `"exposure"`, with: `"Exposure"`, pointer: "/Exposure", detail: `did you mean "exposure"?`},
		{name: "missing member", replace: `"width": "16 in", `, with: ``, pointer: "/section/width", detail: "width is missing; a rectangular section needs it", allowed: "a length, e.g."},
		{name: "missing section", replace: `"section": {"shape": "rectangular", "width": "16 in", "depth": "26 in"},`, with: ``, pointer: "/section", detail: "section is missing", allowed: "an object with shape, width, web_width, depth"},
		{name: "missing code", replace: `"code": "ACI 318-19",`, with: ``, pointer: "/code", detail: "code is missing"},
		{name: "null member", replace: `"16 in"`, with: `null`, pointer: "/section/width", detail: "width is null; leave out what is not known", allowed: "a length in"},
		{name: "null object", replace: `{"attached": "fragile", "months": 60}`, with: `null`, pointer: "/serviceability", detail: "serviceability is null", allowed: "an object with attached, months"},
		{name: "null item", replace: `["27 ft"]`, with: `[null]`, pointer: "/spans/0", detail: "spans item 1 is null", allowed: "a length in"},
		{name: "text for list", replace: `["27 ft"]`, with: `"27 ft"`, pointer: "/spans", detail: `spans is text ("27 ft"); it must be a list`, allowed: "a list of 1 to 20 items"},
		{name: "object for list", replace: `["27 ft"]`, with: `{"0": "27 ft"}`, pointer: "/spans", detail: "spans is an object; it must be a list", allowed: "a list of"},
		{name: "text for object", replace: `{"attached": "fragile", "months": 60}`, with: `"fragile"`, pointer: "/serviceability", detail: `serviceability is text ("fragile"); it must be an object`, allowed: "an object with"},
		{name: "number for text", replace: `"ACI 318-19"`, with: `318`, pointer: "/code", detail: "code is a number (318); it must be text", allowed: "text"},
		{name: "text for true", replace: `"exposure"`, with: `"self_weight": "false", "exposure"`, pointer: "/self_weight", detail: `self_weight is text ("false"); it must be true or false`, allowed: "true or false"},
		{name: "text for count", replace: `"months": 60`, with: `"months": "60"`, pointer: "/serviceability/months", detail: `months is text ("60"); it must be a whole number`, allowed: "a whole number from 1 to 1200"},
		{name: "fraction for count", replace: `"months": 60`, with: `"months": 60.5`, pointer: "/serviceability/months", detail: "months is 60.5", allowed: "a whole number from 1 to 1200"},
		{name: "exponent for count", replace: `"months": 60`, with: `"months": 6e1`, pointer: "/serviceability/months", detail: "written with digits alone", allowed: "a whole number from 1 to 1200"},
		{name: "huge count", replace: `"months": 60`, with: `"months": 9999999999999`, pointer: "/serviceability/months", detail: "months is 9999999999999", allowed: "a whole number from 1 to 1200"},
		{name: "zero count", replace: `"max_layers": 2`, with: `"max_layers": 0`, pointer: "/preferences/max_layers", detail: "max_layers is 0; it must be a whole number from 1 to 4", allowed: "a whole number from 1 to 4"},
		{name: "count too large", replace: `"max_layers": 2`, with: `"max_layers": 5`, pointer: "/preferences/max_layers", detail: "max_layers is 5", allowed: "a whole number from 1 to 4"},
		{name: "two zones", replace: `"max_layers": 2`, with: `"max_zones": 2`, pointer: "/preferences/max_zones", detail: "2", allowed: "1, 3"},
		{name: "share above one", replace: `"sustained": 0.5`, with: `"sustained": 50`, pointer: "/loads/1/sustained", detail: "sustained is 50; it must be a number from 0 to 1", allowed: "a number from 0 to 1"},
		{name: "share below zero", replace: `"sustained": 0.5`, with: `"sustained": -0.1`, pointer: "/loads/1/sustained", detail: "sustained is -0.1", allowed: "a number from 0 to 1"},
		{name: "share beyond float64", replace: `"sustained": 0.5`, with: `"sustained": 1e999`, pointer: "/loads/1/sustained", detail: "out of range", allowed: "a number from 0 to 1"},
		{name: "empty list", replace: `["#8", "#9"]`, with: `[]`, pointer: "/preferences/bars", detail: "bars has 0 items", allowed: "a list of 1 to 20 items"},
		{name: "too many spans", replace: `["27 ft"]`, with: `[` + strings.Repeat(`"27 ft",`, 30) + `"27 ft"]`, pointer: "/spans", detail: "spans has 31 items", allowed: "a list of 1 to 20 items"},
		{name: "endless reference", replace: `"RB-3, records room"`, with: `"` + strings.Repeat("B", 300) + `"`, pointer: "/reference", detail: "reference has 300 characters", allowed: "text of at most 200 characters"},

		// Words.
		{name: "unknown code", replace: `"ACI 318-19"`, with: `"ACI 318-91"`, pointer: "/code", detail: `code is "ACI 318-91"`, allowed: "ACI 318-19, ACI 318M-19"},
		{name: "unknown catalog", replace: `"astm-inch"`, with: `"astm-inches"`, pointer: "/reinforcement/catalog", detail: `did you mean "astm-inch"?`, allowed: "astm-inch, astm-metric"},
		{name: "unknown size", replace: `["#8", "#9"]`, with: `["#8", "#12"]`, pointer: "/preferences/bars/1", detail: `"#12"`},
		{name: "size twice", replace: `["#8", "#9"]`, with: `["#8", "#8"]`, pointer: "/preferences/bars/1", detail: "twice", allowed: "each size once"},
		{name: "size of another catalog", replace: `["#3"]`, with: `["N12"]`, pointer: "/preferences/stirrups/0", detail: `"N12"`},
		{name: "unknown shape", replace: `"rectangular"`, with: `"circular"`, pointer: "/section/shape", detail: `shape is "circular"; it must be one of rectangular, tee, ell, inverted-tee, polygon`, allowed: "rectangular, tee, ell, inverted-tee, polygon"},
		{name: "word of another case", replace: `"interior"`, with: `"Interior"`, pointer: "/exposure", detail: `did you mean "interior"?`, allowed: "interior, weather, ground"},
		{name: "empty word", replace: `"interior"`, with: `""`, pointer: "/exposure", detail: `exposure is ""`, allowed: "interior, weather, ground"},
		{name: "unknown support", replace: `"kind": "pinned"`, with: `"kind": "hinge"`, pointer: "/supports/0/kind", detail: `kind is "hinge"`, allowed: "pinned, roller, fixed, free"},
		{name: "unknown case", replace: `"case": "live"`, with: `"case": "life"`, pointer: "/loads/1/case", detail: `did you mean "live"?`, allowed: "dead, live, roof-live"},
		{name: "unknown preference", replace: `"least-steel"`, with: `"cheapest"`, pointer: "/preferences/prefer", detail: `prefer is "cheapest"`, allowed: "least-steel, fewest-bars"},
		{name: "unknown system", replace: `"exposure"`, with: `"report_in": "metric", "exposure"`, pointer: "/report_in", detail: `report_in is "metric"`, allowed: "us, si"},
		{name: "unknown detail", replace: `"exposure"`, with: `"detail": "all", "exposure"`, pointer: "/detail", detail: `detail is "all"`, allowed: "full"},
		{name: "unknown pattern", replace: `"exposure"`, with: `"pattern": "all", "exposure"`, pointer: "/pattern", detail: `pattern must be one of false, spans, code, loads`, allowed: "false, spans, code, loads"},
		{name: "true for pattern", replace: `"exposure"`, with: `"pattern": true, "exposure"`, pointer: "/pattern", detail: `(given: true)`, allowed: "false, spans, code, loads"},
		{name: "unknown reading", replace: `"exposure"`, with: `"shear_row": "c", "exposure"`, pointer: "/shear_row", detail: `shear_row is "c"`, allowed: "larger, a, b"},

		// Contradictions.
		{name: "force on a uniform load", replace: `"intensity": "1.05 kip/ft"`, with: `"intensity": "1.05 kip/ft", "force": "1 kip"`, pointer: "/loads/0/force", detail: "force does not belong to a uniform load, which has intensity"},
		{name: "uniform load without intensity", replace: `, "intensity": "1.05 kip/ft"`, with: ``, pointer: "/loads/0/intensity", detail: "intensity is missing; a uniform load needs it", allowed: "a line load"},
		{name: "point load without place", replace: `"shape": "uniform", "intensity": "1.05 kip/ft"`, with: `"shape": "point", "force": "10 kip"`, pointer: "/loads/0/at", detail: "at is missing; a point load needs it"},
		{name: "point load beyond the span", replace: `"shape": "uniform", "intensity": "1.05 kip/ft"`, with: `"shape": "point", "force": "10 kip", "at": "28 ft"`, pointer: "/loads/0/at", detail: "at is 336 in", allowed: "0 in to 324 in"},
		{name: "partial load backwards", replace: `"shape": "uniform", "intensity": "1.05 kip/ft"`, with: `"shape": "partial", "intensity": "1 kip/ft", "from": "20 ft", "to": "10 ft"`, pointer: "/loads/0/to", detail: "from 240 in to 120 in", allowed: "beyond from"},
		{name: "load on a span there is not", replace: `"intensity": "1.05 kip/ft"`, with: `"intensity": "1.05 kip/ft", "span": 2`, pointer: "/loads/0/span", detail: "2", allowed: "1"},
		{name: "one support", replace: `, {"kind": "roller", "width": "12 in"}`, with: ``, pointer: "/supports", detail: "supports has 1 item", allowed: "a list of 2 to 21 items"},
		{name: "three supports", replace: `, {"kind": "roller", "width": "12 in"}`, with: `, {"kind": "roller"}, {"kind": "roller"}`, pointer: "/supports", detail: "3 supports given for one span", allowed: "2"},
		{name: "two spans", replace: `["27 ft"]`, with: `["27 ft", "20 ft"]`, pointer: "/spans", detail: "2 spans given", allowed: "one span"},
		{name: "mechanism", replace: `"kind": "roller", "width": "12 in"`, with: `"kind": "free"`, pointer: "/supports", detail: "not held", allowed: "two supports that hold, or one fixed end"},
		{name: "spans and demands", replace: `"exposure"`, with: `"demands": [{"moment": "1 kip-ft"}], "exposure"`, pointer: "/demands", detail: "not both"},
		{name: "no load at all", replace: `"loads": [
    {"case": "dead", "shape": "uniform", "intensity": "1.05 kip/ft"},
    {"case": "live", "shape": "uniform", "intensity": "1.4 kip/ft", "sustained": 0.5}
  ]`, with: `"loads": [], "self_weight": false`, pointer: "/loads", detail: "there is no load"},
		{name: "neither exposure nor cover", replace: `"exposure": "interior",`, with: ``, pointer: "/exposure", detail: "neither exposure nor cover is given", allowed: "interior, weather, ground"},

		// Demands.
		{name: "demand without force", request: goodDemands, replace: `"shear": "45 kip"`, with: `"name": "x"`, status: 400, pointer: "/demands/1/name", detail: `the member "name" is given twice`},
		{name: "demand of nothing", request: goodDemands, replace: `, "shear": "45 kip"`, with: ``, pointer: "/demands/1", detail: "has no force", allowed: "at least one of moment, shear, torque, axial"},
		{name: "demands of one name", request: goodDemands, replace: `"support"`, with: `"midspan"`, pointer: "/demands/1/name", detail: `name "midspan"`, allowed: "a name of its own"},
		{name: "moment as force", request: goodDemands, replace: `"300 kip-ft"`, with: `"300 kip"`, pointer: "/demands/0/moment", detail: `has the unit "kip"`, allowed: "a moment in"},
		{name: "neither spans nor demands", request: goodDemands, replace: `"demands": [{"name": "midspan", "moment": "300 kip-ft"}, {"name": "support", "shear": "45 kip"}],`, with: ``, pointer: "/spans", detail: "spans are missing", allowed: "one span"},

		// The document.
		{name: "duplicate member", replace: `"width": "16 in"`, with: `"width": "16 in", "width": "18 in"`, status: 400, pointer: "/section/width", detail: `the member "width" is given twice`},
		{name: "trailing data", replace: `"alternatives": 1}`, with: `"alternatives": 1}} {`, status: 400, detail: "the document goes on after its value"},
		{name: "cut short", replace: `"alternatives": 1}`, with: `"alternatives": 1`, status: 400, detail: "the document ends before it is complete"},
		{name: "bare NaN", replace: `"sustained": 0.5`, with: `"sustained": NaN`, status: 400, pointer: "/loads/1/sustained", detail: "the document is not JSON"},
		{name: "comment", replace: `"exposure"`, with: `/* note */ "exposure"`, status: 400, detail: "the document is not JSON"},
		{name: "trailing comma", replace: `["27 ft"]`, with: `["27 ft",]`, status: 400, pointer: "/spans", detail: "the document is not JSON"},
		{name: "single quotes", replace: `"16 in"`, with: `'16 in'`, status: 400, pointer: "/section/width", detail: "the document is not JSON"},
		{name: "broken UTF-8", replace: `"RB-3, records room"`, with: "\"\xff\"", status: 400, pointer: "/reference", detail: "the document is not JSON"},
		{name: "too deep", replace: `"exposure"`, with: `"x": ` + strings.Repeat(`[`, 40) + strings.Repeat(`]`, 40) + `, "exposure"`, status: 400, detail: "nested deeper than 16 levels"},
		{name: "too many values", replace: `"exposure"`, with: `"x": [` + strings.Repeat(`0,`, 25000) + `0], "exposure"`, status: 400, detail: "more than 20000 names and values"},
	}
}

func onOtherDoors() map[string][]badInput {
	return map[string][]badInput{
		"/v1/checks": {
			{name: "faulty brief", replace: `"16 in"`, with: `16`, pointer: "/brief/section/width", detail: "width needs a unit", allowed: "a length in"},
			{name: "range in the brief", replace: `"16 in"`, with: `"16 m"`, pointer: "/brief/section/width", detail: "width is", allowed: "in to"},
			{name: "unknown size", replace: `"bar": "#9"`, with: `"bar": "#12"`, pointer: "/layout/longitudinal/0/bar", detail: `"#12"`},
			{name: "no bars", replace: `"count": 4`, with: `"count": 0`, pointer: "/layout/longitudinal/0/count", detail: "count is 0", allowed: "a whole number from 1 to 200"},
			{name: "unknown face", replace: `"face": "top"`, with: `"face": "left"`, pointer: "/layout/longitudinal/1/face", detail: `face is "left"`, allowed: "bottom, top, side"},
			{name: "layer on a side", replace: `"face": "bottom", "layer": 1`, with: `"face": "side", "layer": 1`, pointer: "/layout/longitudinal/0/layer", detail: "layer does not belong to a row of side bars, which has spacing"},
			{name: "side bars without spacing", replace: `"face": "bottom", "layer": 1`, with: `"face": "side"`, pointer: "/layout/longitudinal/0/spacing", detail: "spacing is missing"},
			{name: "spacing of bottom bars", replace: `"layer": 1`, with: `"spacing": "3 in"`, pointer: "/layout/longitudinal/0/spacing", detail: "spacing does not belong to a row in the web, which has flange, layer"},
			{name: "from without to", replace: `"layer": 1`, with: `"from": "1 ft"`, pointer: "/layout/longitudinal/0/to", detail: "to is missing"},
			{name: "cut-off", replace: `"layer": 1`, with: `"from": "3 ft", "to": "20 ft"`, pointer: "/layout/longitudinal/0/to", detail: "36 in to 240 in", allowed: "324 in"},
			{name: "hooked end", replace: `"layer": 1`, with: `"end": "hook"`, pointer: "/layout/longitudinal/0/end", detail: `end is "hook"`, allowed: "straight"},
			{name: "one leg", replace: `"legs": 2`, with: `"legs": 1`, pointer: "/layout/transverse/0/legs", detail: "legs is 1", allowed: "a whole number from 2 to 12"},
			{name: "zero spacing", replace: `"9 in"`, with: `"0 in"`, pointer: "/layout/transverse/0/spacing", detail: "spacing is 0", allowed: "above zero"},
			{name: "zone beyond the span", replace: `"9 in"`, with: `"9 in", "to": "30 ft"`, pointer: "/layout/transverse/0/to", detail: "360 in"},
			{name: "too few stirrups", replace: `"9 in"`, with: `"9 in", "count": 3`, pointer: "/layout/transverse/0/count", detail: "3 stirrups", allowed: "36, or 37"},
			{name: "missing layout", replace: `, "layout": ` + goodLayout, with: ``, pointer: "/layout", detail: "layout is missing", allowed: "an object with longitudinal, transverse"},
		},
		"/v1/strengths": {
			{name: "no steel", replace: `"layers": [{"area": "3.16 in2", "depth": "23.5 in", "yield": "60 ksi"}, {"area": "0.40 in2", "depth": "2.5 in", "yield": "60 ksi"}],`, with: `"layers": [],`, pointer: "/layers", detail: "layers has 0 items", allowed: "a list of 1 to 40 items"},
			{name: "area as length", replace: `"3.16 in2"`, with: `"3.16 in"`, pointer: "/layers/0/area", detail: `has the unit "in"`, allowed: "an area in"},
			{name: "negative area", replace: `"3.16 in2"`, with: `"-3.16 in2"`, pointer: "/layers/0/area", detail: "it must be above zero", allowed: "above zero"},
			{name: "steel below the beam", replace: `"23.5 in"`, with: `"33.5 in"`, pointer: "/layers/0/depth", detail: "33.5 in"},
			{name: "unknown sense", replace: `"positive"`, with: `"sagging"`, pointer: "/bending", detail: `bending is "sagging"`, allowed: "positive, negative"},
			{name: "zero spacing", replace: `"9 in"`, with: `"0 in"`, pointer: "/stirrups/spacing", detail: "above zero", allowed: "above zero"},
			{name: "absurd strength", replace: `"4.5 ksi"`, with: `"4500 ksi"`, pointer: "/concrete/strength", detail: "4500 ksi", allowed: "ksi"},
			{name: "demand of nothing", replace: `"demand": {"moment": "250 kip-ft", "shear": "45 kip", "torque": "0 kip-ft", "axial": "0 kip"}`, with: `"demand": {}`, pointer: "/demand", detail: "has no force"},
		},
		"/v1/fits": {
			{name: "unknown size", replace: `"#9", "count": 4`, with: `"#12", "count": 4`, pointer: "/layers/0/size", detail: `size is "#12", which is not in astm-inch`, allowed: "#3, #4"},
			{name: "unknown catalog", replace: `"astm-inch"`, with: `"astm"`, pointer: "/stirrup/catalog", detail: `did you mean "astm-inch"?`, allowed: "astm-inch"},
			{name: "cover of half the width", replace: `"1.5 in"`, with: `"8 in"`, pointer: "/cover", detail: "cover is 8 in", allowed: "less than half the smaller side"},
			{name: "negative cover", replace: `"1.5 in"`, with: `"-1.5 in"`, pointer: "/cover", detail: "cover is -1.5 in", allowed: "zero"},
			{name: "narrow", replace: `"16 in"`, with: `"16 mm"`, pointer: "/width", detail: "width is 0.629921259843 in", allowed: "50 mm to 10 m"},
			{name: "no bars", replace: `"count": 4`, with: `"count": 0`, pointer: "/layers/0/count", detail: "count is 0", allowed: "a whole number from 1 to 200"},
			{name: "bundle of five", replace: `"#9", "count": 4`, with: `"#9", "count": 5, "bundled": 5`, pointer: "/layers/0/bundled", detail: "bundled is 5", allowed: "a whole number from 1 to 4"},
			{name: "bundle that is left over", replace: `"#9", "count": 4`, with: `"#9", "count": 4, "bundled": 3`, pointer: "/layers/0/bundled", detail: "4 bars do not make up bundles of it", allowed: "a divisor of count"},
			{name: "bundle of none", replace: `"#9", "count": 4`, with: `"#9", "count": 4, "bundled": 0`, pointer: "/layers/0/bundled", detail: "bundled is 0", allowed: "a whole number from 1 to 4"},
			{name: "thick stirrup", replace: `"size": "#4"`, with: `"size": "#18"`, pointer: "/stirrup/size", detail: "#18"},
		},
	}
}

func TestBadInput(t *testing.T) {
	s := newService(t)
	doors := onOtherDoors()
	doors["/v1/designs"] = slices.Concat(onBrief(), onSections(), onTorques())
	doors["/v1/checks"] = append(doors["/v1/checks"], onLayouts()...)
	doors["/v1/strengths"] = append(doors["/v1/strengths"], onBareSections()...)
	kinds := 0
	for path, list := range doors {
		for _, tc := range list {
			kinds++
			t.Run(strings.TrimPrefix(path, "/v1/")+"/"+tc.name, func(t *testing.T) {
				request := tc.request
				if request == "" {
					request = goodRequests()[path]
				}
				require.Contains(t, request, tc.replace, "the case changes nothing")
				w := send(s, "POST", path, strings.Replace(request, tc.replace, tc.with, 1))
				want := tc.status
				if want == 0 {
					want = http.StatusUnprocessableEntity
				}
				require.Equal(t, want, w.Code, w.Body.String())
				p := problemOf(t, w)
				require.Equal(t, path, p.Instance)
				for _, e := range p.Errors {
					if e.Path == tc.pointer && strings.Contains(e.Detail, tc.detail) && strings.Contains(e.Allowed, tc.allowed) {
						return
					}
				}
				require.Fail(t, "no such fault", "%q %q %q among\n%s", tc.pointer, tc.detail, tc.allowed, w.Body)
			})
		}
	}
	require.GreaterOrEqual(t, kinds, 200)
}

func TestBadRequests(t *testing.T) {
	s := newService(t)
	for _, tc := range []struct {
		name, method, path, body string
		header                   []string
		status                   int
		problem, detail          string
	}{
		{"empty body", "POST", "/v1/designs", "", []string{"Content-Type", "application/json"}, 400, "malformed", "the document is empty"},
		{"no type", "POST", "/v1/designs", goodBrief, []string{"Content-Type", ""}, 415, "media-type", "must be application/json"},
		{"form", "POST", "/v1/designs", "a=b", []string{"Content-Type", "application/x-www-form-urlencoded"}, 415, "media-type", "x-www-form-urlencoded"},
		{"other charset", "POST", "/v1/designs", goodBrief, []string{"Content-Type", "application/json; charset=utf-16"}, 415, "media-type", "utf-16"},
		{"broken type", "POST", "/v1/designs", goodBrief, []string{"Content-Type", "application/json; charset"}, 415, "media-type", "must be application/json"},
		{"compressed", "POST", "/v1/designs", goodBrief, []string{"Content-Encoding", "gzip"}, 415, "media-type", "gzip"},
		{"page wanted", "POST", "/v1/designs", goodBrief, []string{"Accept", "text/html"}, 406, "not-acceptable", "text/html"},
		{"drawing wanted", "POST", "/v1/designs", goodBrief, []string{"Accept", "image/svg+xml"}, 406, "not-acceptable", "image/svg+xml"},
		{"anything but JSON", "POST", "/v1/designs", goodBrief, []string{"Accept", "*/*, application/json;q=0"}, 406, "not-acceptable", "q=0"},
		{"too large", "POST", "/v1/designs", strings.Repeat(" ", 300<<10), nil, 413, "too-large", "262144 bytes"},
		{"wrong method", "GET", "/v1/designs", "", nil, 405, "method", "does not take this method"},
		{"wrong method on a list", "POST", "/v1/bars", "{}", nil, 405, "method", "does not take this method"},
		{"no door", "GET", "/v1/nothing", "", nil, 404, "not-found", "no door"},
		{"no version", "POST", "/designs", goodBrief, nil, 404, "not-found", "no door"},
		{"door with a slash", "POST", "/v1/designs/", goodBrief, nil, 404, "not-found", "no door"},
		{"no catalog", "GET", "/v1/bars/astm-inches", "", nil, 404, "not-found", `did you mean "astm-inch"?`},
		{"no problem", "GET", "/problems/none", "", nil, 404, "not-found", "no problem"},
		{"other host", "POST", "/v1/designs", goodBrief, []string{"Host", "evil.example"}, 421, "host", "evil.example"},
		{"other origin", "POST", "/v1/designs", goodBrief, []string{"Origin", "https://evil.example"}, 403, "cross-origin", "web pages"},
		{"cross-site", "POST", "/v1/designs", goodBrief, []string{"Sec-Fetch-Site", "cross-site"}, 403, "cross-origin", "web pages"},
	} {
		t.Run(tc.name, func(t *testing.T) {
			w := send(s, tc.method, tc.path, tc.body, tc.header...)
			require.Equal(t, tc.status, w.Code, w.Body.String())
			p := problemOf(t, w)
			require.Equal(t, "/problems/"+tc.problem, p.Type)
			require.Contains(t, p.Detail, tc.detail)
			if tc.status == 405 {
				require.NotEmpty(t, w.Header().Get("Allow"))
			}
		})
	}
}

func TestAllFaultsComeInOneReply(t *testing.T) {
	s := newService(t)
	bad := goodBrief
	for _, change := range [][2]string{
		{`"16 in"`, `16`},                          // structure
		{`"exposure": "interior"`, `"exposed": 1`}, // structure
		{`"months": 60`, `"months": 0`},            // range
		{`, "intensity": "1.05 kip/ft"`, ``},       // contradiction
		{`"4.5 ksi"`, `"4500 ksi"`},                // bounds of the beam
		{`"ACI 318-19"`, `"ACI 319"`},              // what is offered
	} {
		require.Contains(t, bad, change[0])
		bad = strings.Replace(bad, change[0], change[1], 1)
	}
	pointers := func(body string) []string {
		w := send(s, "POST", "/v1/designs", body)
		require.Equal(t, http.StatusUnprocessableEntity, w.Code, w.Body.String())
		var list []string
		for _, e := range problemOf(t, w).Errors {
			list = append(list, e.Path)
		}
		return list
	}
	require.ElementsMatch(t, []string{"/section/width", "/exposed", "/serviceability/months", "/code", "/loads/0/intensity"}, pointers(bad))
	known := strings.Replace(bad, `"ACI 319"`, `"ACI 318-19"`, 1)
	require.ElementsMatch(t, []string{"/section/width", "/exposed", "/exposure", "/serviceability/months", "/loads/0/intensity", "/concrete/strength"}, pointers(known))
}

func TestFaultsListedAreBounded(t *testing.T) {
	s := newService(t)
	var b strings.Builder
	for range 500 {
		b.WriteString(`{},`)
	}
	w := send(s, "POST", "/v1/designs", strings.Replace(goodBrief, `"loads": [`, `"loads": [`+b.String(), 1))
	p := decode[wire.Problem](t, w)
	require.Len(t, p.Errors, 101)
	require.Contains(t, p.Errors[100].Detail, "further faults are not listed")
}
