package service_test

import "strings"

const (
	rectangle = `{"shape": "rectangular", "width": "16 in", "depth": "26 in"}`
	tee       = `{"shape": "tee", "web_width": "14 in", "depth": "24 in", "flange_thickness": "5 in", "flange_width": "48 in"}`
	floorTee  = `{"shape": "tee", "web_width": "14 in", "depth": "24 in", "flange_thickness": "5 in", "slab": {"clear_left": "7 ft", "clear_right": "8 ft"}}`
	ledges    = `{"shape": "inverted-tee", "web_width": "14 in", "depth": "28 in", "flange_thickness": "8 in", "flange_width": "26 in"}`
	box       = `{"shape": "polygon", "outline": [{"x": "0 in", "y": "0 in"}, {"x": "24 in", "y": "0 in"}, {"x": "24 in", "y": "30 in"}, {"x": "0 in", "y": "30 in"}],
    "voids": [[{"x": "7 in", "y": "7 in"}, {"x": "17 in", "y": "7 in"}, {"x": "17 in", "y": "23 in"}, {"x": "7 in", "y": "23 in"}]]}`
	leaning = `{"shape": "polygon", "outline": [{"x": "0 in", "y": "0 in"}, {"x": "12 in", "y": "0 in"}, {"x": "36 in", "y": "30 in"}, {"x": "24 in", "y": "30 in"}]}`
	legged  = `{"shape": "polygon", "outline": [{"x": "0 in", "y": "0 in"}, {"x": "8 in", "y": "0 in"}, {"x": "8 in", "y": "20 in"}, {"x": "24 in", "y": "20 in"},
    {"x": "24 in", "y": "0 in"}, {"x": "32 in", "y": "0 in"}, {"x": "32 in", "y": "30 in"}, {"x": "0 in", "y": "30 in"}]}`
)

// of is a request with another section.
func of(request, section string) string { return strings.Replace(request, rectangle, section, 1) }

func onSections() []badInput {
	t, floor, inverted, hollow := of(goodBrief, tee), of(goodBrief, floorTee), of(goodBrief, ledges), of(goodBrief, box)
	const width = `"flange_width": "48 in"`
	const slab = `"slab": {"clear_left": "7 ft", "clear_right": "8 ft"}`
	return []badInput{
		// Members that a shape lacks, and those of other shapes.
		{name: "tee without web", request: t, replace: `"web_width": "14 in", `, with: ``, pointer: "/section/web_width", detail: "web_width is missing; a tee section needs it", allowed: "a length, e.g."},
		{name: "tee without depth", request: t, replace: `"depth": "24 in", `, with: ``, pointer: "/section/depth", detail: "depth is missing; a tee section needs it"},
		{name: "tee without thickness", request: t, replace: `"flange_thickness": "5 in", `, with: ``, pointer: "/section/flange_thickness", detail: "flange_thickness is missing; a tee section needs it"},
		{name: "tee without flange", request: t, replace: `, ` + width, with: ``, pointer: "/section/flange_width", detail: "flange_width is missing, and no slab is given in its place", allowed: "or a slab"},
		{name: "tee with two flanges", request: t, replace: width, with: width + ", " + slab, pointer: "/section/slab", detail: "slab is given beside flange_width"},
		{name: "tee with a width", request: t, replace: `"web_width": "14 in"`, with: `"width": "14 in"`, pointer: "/section/width", detail: "width does not belong to a tee section, which has web_width, depth, flange_thickness, flange_width, slab, isolated"},
		{name: "tee with an outline", request: t, replace: width, with: width + `, "outline": [{"x": "0 in", "y": "0 in"}, {"x": "1 in", "y": "0 in"}, {"x": "0 in", "y": "1 in"}]`, pointer: "/section/outline", detail: "outline does not belong to a tee section"},
		{name: "ell of its own", request: t, replace: `"tee"`, with: `"ell", "isolated": true`, pointer: "/section/isolated", detail: "isolated does not belong to an ell section"},
		{name: "inverted tee without flange", request: inverted, replace: `, "flange_width": "26 in"`, with: ``, pointer: "/section/flange_width", detail: "flange_width is missing; an inverted-tee section needs it"},
		{name: "inverted tee with a slab", request: inverted, replace: `"flange_width": "26 in"`, with: `"flange_width": "26 in", ` + slab, pointer: "/section/slab", detail: "slab does not belong to an inverted-tee section"},
		{name: "rectangle with a web", replace: `"width": "16 in"`, with: `"width": "16 in", "web_width": "16 in"`, pointer: "/section/web_width", detail: "web_width does not belong to a rectangular section, which has width, depth"},
		{name: "rectangle with a flange", replace: `"width": "16 in"`, with: `"width": "16 in", "flange_width": "40 in"`, pointer: "/section/flange_width", detail: "flange_width does not belong to a rectangular section"},
		{name: "rectangle with a hollow", replace: `"width": "16 in"`, with: `"width": "16 in", "voids": [[{"x": "0 in", "y": "0 in"}, {"x": "1 in", "y": "0 in"}, {"x": "0 in", "y": "1 in"}]]`, pointer: "/section/voids", detail: "voids does not belong to a rectangular section"},
		{name: "polygon without outline", request: of(goodBrief, `{"shape": "polygon"}`), replace: `"polygon"`, with: `"polygon", "joist": false`, pointer: "/section/outline", detail: "outline is missing; a polygon section needs it", allowed: "a list of corners"},
		{name: "polygon with a width", request: hollow, replace: `"polygon"`, with: `"polygon", "width": "24 in"`, pointer: "/section/width", detail: "width does not belong to a polygon section, which has outline, voids"},
		{name: "polygon with a depth", request: hollow, replace: `"polygon"`, with: `"polygon", "depth": "30 in"`, pointer: "/section/depth", detail: "depth does not belong to a polygon section"},
		{name: "no shape", replace: `"shape": "rectangular", `, with: ``, pointer: "/section/shape", detail: "shape is missing", allowed: "rectangular, tee, ell, inverted-tee, polygon"},
		{name: "shape in other words", request: t, replace: `"tee"`, with: `"T-beam"`, pointer: "/section/shape", detail: `shape is "T-beam"`, allowed: "rectangular, tee"},

		// Their values.
		{name: "web as force", request: t, replace: `"14 in"`, with: `"14 kip"`, pointer: "/section/web_width", detail: `has the unit "kip"`, allowed: "a length in"},
		{name: "bare web", request: t, replace: `"14 in"`, with: `14`, pointer: "/section/web_width", detail: "web_width needs a unit", allowed: "a length in"},
		{name: "web of a blade", request: t, replace: `"14 in"`, with: `"1 in"`, pointer: "/section/web_width", detail: "width is 1 in", allowed: "2 in to 400 in"},
		{name: "flange of paper", request: t, replace: `"5 in"`, with: `"0.5 in"`, pointer: "/section/flange_thickness", detail: "flange thickness is 0.5 in", allowed: "2 in to 400 in"},
		{name: "flange of the whole depth", request: t, replace: `"5 in"`, with: `"24 in"`, pointer: "/section/flange_thickness", detail: "flange thickness is 24 in", allowed: "less than the depth"},
		{name: "flange of nothing", request: t, replace: `"48 in"`, with: `"0 in"`, pointer: "/section/flange_width", detail: "flange_width is 0 in; it must be above zero", allowed: "above zero"},
		{name: "flange below the web", request: t, replace: `"48 in"`, with: `"12 in"`, pointer: "/section/flange_width", detail: "flange width is 12 in", allowed: "no less than the web, 14 in"},
		{name: "flange of a hall", request: t, replace: `"48 in"`, with: `"48 ft"`, pointer: "/section/flange_width", detail: "flange width is 576 in", allowed: "2 in to 400 in"},
		{name: "isolated as text", request: t, replace: `"tee"`, with: `"tee", "isolated": "yes"`, pointer: "/section/isolated", detail: `isolated is text ("yes")`, allowed: "true or false"},
		{name: "joist as number", replace: `"rectangular"`, with: `"rectangular", "joist": 1`, pointer: "/section/joist", detail: "joist is a number (1)", allowed: "true or false"},
		{name: "slab of no side", request: floor, replace: slab, with: `"slab": {}`, pointer: "/section/slab", detail: "slab has no side", allowed: "at least one of clear_left, clear_right"},
		{name: "slab of no width", request: floor, replace: `"7 ft"`, with: `"0 ft"`, pointer: "/section/slab/clear_left", detail: "clear_left is 0 in; it must be above zero", allowed: "above zero"},
		{name: "slab of a desert", request: floor, replace: `"8 ft"`, with: `"8000 ft"`, pointer: "/section/slab/clear_right", detail: "96000 in", allowed: "0 in to 8000 in"},
		{name: "slab as length", request: floor, replace: slab, with: `"slab": "7 ft"`, pointer: "/section/slab", detail: "it must be an object", allowed: "an object with clear_left, clear_right"},
		{name: "tee at an edge", request: floor, replace: `"clear_left": "7 ft", `, with: ``, pointer: "/section/slab", detail: "a tee has a slab on one side only", allowed: "a slab on both sides, or an ell"},
		{name: "ell in a floor", request: floor, replace: `"tee"`, with: `"ell"`, pointer: "/section/slab", detail: "an ell has a slab on both sides", allowed: "a slab on one side, or a tee"},
		{name: "isolated tee in a floor", request: floor, replace: `"tee"`, with: `"tee", "isolated": true`, pointer: "/section/isolated", detail: "a tee of its own has a flange width"},
		{name: "slab without a span", request: of(goodDemands, floorTee), replace: `"tee"`, with: `"tee", "joist": false`, pointer: "/section/slab", detail: "follows from the clear span", allowed: "a flange_width"},
		{name: "outline as object", request: hollow, replace: `"outline": [{"x": "0 in", "y": "0 in"}, {"x": "24 in", "y": "0 in"}, {"x": "24 in", "y": "30 in"}, {"x": "0 in", "y": "30 in"}]`, with: `"outline": {}`, pointer: "/section/outline", detail: "outline is an object; it must be a list", allowed: "a list of 3 to 200 items"},
		{name: "outline of two corners", request: hollow, replace: `, {"x": "24 in", "y": "30 in"}, {"x": "0 in", "y": "30 in"}`, with: ``, pointer: "/section/outline", detail: "outline has 2 items", allowed: "a list of 3 to 200 items"},
		{name: "corner without y", request: hollow, replace: `{"x": "24 in", "y": "0 in"}`, with: `{"x": "24 in"}`, pointer: "/section/outline/1/y", detail: "y is missing", allowed: "a length in"},
		{name: "corner of bare numbers", request: hollow, replace: `{"x": "24 in", "y": "0 in"}`, with: `[24, 0]`, pointer: "/section/outline/1", detail: "is a list; it must be an object", allowed: "an object with x, y"},
		{name: "corner far off", request: hollow, replace: `{"x": "24 in", "y": "0 in"}`, with: `{"x": "24 ft", "y": "-800 ft"}`, pointer: "/section/outline/1", detail: "-243.84 m", allowed: "-100 m to 100 m"},
		{name: "outline that crosses itself", request: hollow, replace: `{"x": "24 in", "y": "0 in"}, {"x": "24 in", "y": "30 in"}`, with: `{"x": "24 in", "y": "30 in"}, {"x": "24 in", "y": "0 in"}`, pointer: "/section/outline", detail: "do not enclose an area in one piece", allowed: "does not cross or touch itself"},
		{name: "hollow of a leaning outline", request: hollow, replace: `{"x": "24 in", "y": "30 in"}, {"x": "0 in", "y": "30 in"}`, with: `{"x": "64 in", "y": "30 in"}, {"x": "40 in", "y": "30 in"}`, pointer: "/section/voids/0", detail: "a void is no hollow of the section", allowed: "inside the outline"},
		{name: "hollow through the side", request: hollow, replace: `{"x": "17 in", "y": "23 in"}`, with: `{"x": "27 in", "y": "23 in"}`, pointer: "/section/voids/0", detail: "a void is no hollow of the section", allowed: "inside the outline, clear of it"},
		{name: "hollow of two corners", request: hollow, replace: `, {"x": "17 in", "y": "23 in"}, {"x": "7 in", "y": "23 in"}`, with: ``, pointer: "/section/voids/0", detail: "has 2 items", allowed: "a list of 3 to 200 items"},
		{name: "outline without a strip", request: of(goodBrief, leaning), replace: `"polygon"`, with: `"polygon", "joist": false`, pointer: "/section/outline", detail: "no upright strip lies inside the outline", allowed: "a strip that runs through from top to bottom"},
		{name: "outline with legs", request: of(goodBrief, legged), replace: `"polygon"`, with: `"polygon", "joist": false`, pointer: "/section/outline", detail: "falls apart at a level", allowed: "every level cuts in one piece"},

		// The concrete.
		{name: "splitting strength of normalweight", replace: `"4.5 ksi"`, with: `"4.5 ksi", "splitting": "400 psi"`, pointer: "/concrete/splitting", detail: "is given for normalweight concrete", allowed: "a lightweight concrete"},
		{name: "no splitting strength", replace: `"4.5 ksi"`, with: `"4.5 ksi", "kind": "all-lightweight", "splitting": "0 psi"`, pointer: "/concrete/splitting", detail: "splitting is 0 ksi; it must be above zero", allowed: "above zero"},
		{name: "splitting strength as length", replace: `"4.5 ksi"`, with: `"4.5 ksi", "splitting": "400 in"`, pointer: "/concrete/splitting", detail: `has the unit "in"`, allowed: "a stress in"},
		{name: "splitting strength above the strength", replace: `"4.5 ksi"`, with: `"4.5 ksi", "kind": "all-lightweight", "splitting": "40 ksi"`, pointer: "/concrete/splitting", detail: "splitting tensile strength is 40 ksi", allowed: "ksi to"},
		{name: "share of normalweight in percent", replace: `"4.5 ksi"`, with: `"4.5 ksi", "kind": "fine-blend", "normal_share": 50`, pointer: "/concrete/normal_share", detail: "normal_share is 50", allowed: "a number from 0 to 1"},
		{name: "share of normalweight in no blend", replace: `"4.5 ksi"`, with: `"4.5 ksi", "kind": "sand-lightweight", "normal_share": 0.5`, pointer: "/concrete/normal_share", detail: "is given for sand-lightweight concrete", allowed: "a fine-blend or coarse-blend concrete"},
		{name: "share of normalweight as text", replace: `"4.5 ksi"`, with: `"4.5 ksi", "normal_share": "1/2"`, pointer: "/concrete/normal_share", detail: "normal_share is text", allowed: "a number from 0 to 1"},
		{name: "fibres by dosage", replace: `"4.5 ksi"`, with: `"4.5 ksi", "fibres": "100 lb/yd3"`, pointer: "/concrete/fibres", detail: "fibres is text", allowed: "true or false"},
		{name: "unknown kind", replace: `"4.5 ksi"`, with: `"4.5 ksi", "kind": "light"`, pointer: "/concrete/kind", detail: `kind is "light"`, allowed: "normalweight, sand-lightweight, all-lightweight, fine-blend, coarse-blend"},
	}
}

func onTorques() []badInput {
	const dead = `"shape": "uniform", "intensity": "1.05 kip/ft"`
	return []badInput{
		{name: "path of a uniform load", replace: dead, with: dead + `, "path": "equilibrium"`, pointer: "/loads/0/path", detail: "path does not belong to a uniform load, which has intensity"},
		{name: "unknown path", replace: dead, with: `"shape": "torque", "moment": "5 kip-ft", "at": "9 ft", "path": "primary"`, pointer: "/loads/0/path", detail: `path is "primary"`, allowed: "equilibrium, compatibility"},
		{name: "torque without place", replace: dead, with: `"shape": "torque", "moment": "5 kip-ft"`, pointer: "/loads/0/at", detail: "at is missing; a torque load needs it"},
		{name: "spread torque with a place", replace: dead, with: `"shape": "uniform-torque", "moment": "5 kip-ft", "at": "9 ft"`, pointer: "/loads/0/at", detail: "at does not belong to a uniform-torque load, which has moment, path"},
		{name: "torque a length", replace: dead, with: `"shape": "uniform-torque", "moment": "5 kip-ft/ft"`, pointer: "/loads/0/moment", detail: "is of moment over length (multiply by the length that it acts on)", allowed: "a moment in"},
		{name: "torque as force", replace: dead, with: `"shape": "torque", "moment": "5 kip", "at": "9 ft"`, pointer: "/loads/0/moment", detail: `has the unit "kip"`, allowed: "a moment in"},
		{name: "path of no torque", request: goodDemands, replace: `"shear": "45 kip"`, with: `"shear": "45 kip", "path": "compatibility"`, pointer: "/demands/1/path", detail: "path belongs to a torque, and none is given"},
		{name: "unknown path of a demand", request: goodDemands, replace: `"shear": "45 kip"`, with: `"torque": "45 kip-ft", "path": "x"`, pointer: "/demands/1/path", detail: `path is "x"`, allowed: "equilibrium, compatibility"},
		{name: "angle in words", replace: `"exposure"`, with: `"torsion_angle": "45 degrees", "exposure"`, pointer: "/torsion_angle", detail: "torsion_angle is text", allowed: "a number from 10 to 80"},
		{name: "flat angle", replace: `"exposure"`, with: `"torsion_angle": 5, "exposure"`, pointer: "/torsion_angle", detail: "torsion_angle is 5", allowed: "a number from 10 to 80"},
		{name: "no angle", replace: `"exposure"`, with: `"torsion_angle": 0, "exposure"`, pointer: "/torsion_angle", detail: "torsion_angle is 0", allowed: "a number from 10 to 80"},
		{name: "angle beyond the code", replace: `"exposure"`, with: `"torsion_angle": 25, "exposure"`, pointer: "/torsion_angle", detail: "angle is 25 degrees", allowed: "30 to 60 degrees (22.7.6.1.2)"},
		{name: "side bars counted by number", replace: `"exposure"`, with: `"count_side_bars": 2, "exposure"`, pointer: "/count_side_bars", detail: "count_side_bars is a number", allowed: "true or false"},
		{name: "bundles of five", replace: `"max_layers": 2`, with: `"bundles": 5`, pointer: "/preferences/bundles", detail: "bundles is 5", allowed: "a whole number from 1 to 4"},
		{name: "bundles as answer", replace: `"max_layers": 2`, with: `"bundles": true`, pointer: "/preferences/bundles", detail: "bundles is true or false", allowed: "a whole number from 1 to 4"},
	}
}

func onLayouts() []badInput {
	flanged := of(goodCheck, tee)
	const bottom, topRow = `{"bar": "#9", "count": 4, "face": "bottom", "layer": 1}`, `{"bar": "#5", "count": 2, "face": "top"}`
	const stirrups = `"transverse": [`
	bent := strings.Replace(goodCheck, stirrups, `"bent": [{"bar": "#8", "count": 2, "at": "3 ft", "angle": 45, "rises": "left", "bends": 2, "spacing": "10 in"}], `+stirrups, 1)
	const zone = `"legs": 2, "spacing": "9 in"`
	return []badInput{
		{name: "row in no flange", replace: topRow, with: topRow + `, {"bar": "#5", "count": 2, "face": "top", "flange": true, "spacing": "6 in"}`, pointer: "/layout/longitudinal/2/flange", detail: "the section has no flange at the top", allowed: "a face with a flange"},
		{name: "row in the flange of another face", request: flanged, replace: topRow, with: topRow + `, {"bar": "#5", "count": 2, "face": "bottom", "flange": true, "spacing": "6 in"}`, pointer: "/layout/longitudinal/2/flange", detail: "the section has no flange at the bottom"},
		{name: "flange row without spacing", request: flanged, replace: topRow, with: topRow + `, {"bar": "#5", "count": 2, "face": "top", "flange": true}`, pointer: "/layout/longitudinal/2/spacing", detail: "spacing is missing; a row in a flange needs it", allowed: "a length, e.g."},
		{name: "flange row without distance", request: flanged, replace: topRow, with: topRow + `, {"bar": "#5", "count": 2, "face": "top", "flange": true, "spacing": "0 in"}`, pointer: "/layout/longitudinal/2/spacing", detail: "it is 0 in", allowed: "above zero"},
		{name: "bundles in a flange", request: flanged, replace: topRow, with: topRow + `, {"bar": "#5", "count": 2, "face": "top", "flange": true, "spacing": "6 in", "bundled": 2}`, pointer: "/layout/longitudinal/2/bundled", detail: "bundled does not belong to a row in a flange"},
		{name: "second layer in a flange", request: flanged, replace: topRow, with: topRow + `, {"bar": "#5", "count": 2, "face": "top", "flange": true, "spacing": "6 in", "layer": 2}`, pointer: "/layout/longitudinal/2", detail: "bars in a flange lie in layer 2"},
		{name: "flange as word", request: flanged, replace: `"face": "top"`, with: `"face": "top", "flange": "left"`, pointer: "/layout/longitudinal/1/flange", detail: "flange is text", allowed: "true or false"},
		{name: "bundle that is left over", replace: `"count": 4`, with: `"count": 4, "bundled": 3`, pointer: "/layout/longitudinal/0/bundled", detail: "4 bars do not make up bundles of 3", allowed: "a divisor of count"},
		{name: "bundle of five", replace: `"count": 4`, with: `"count": 5, "bundled": 5`, pointer: "/layout/longitudinal/0/bundled", detail: "bundled is 5", allowed: "a whole number from 1 to 4"},
		{name: "yield of a row in psi", replace: `"count": 4`, with: `"count": 4, "yield": "60 psi"`, pointer: "/layout/longitudinal/0/yield", detail: "yield strength is 0.06 ksi", allowed: "15 ksi to 200 ksi"},
		{name: "no yield of a row", replace: `"count": 4`, with: `"count": 4, "yield": "0 ksi"`, pointer: "/layout/longitudinal/0/yield", detail: "it must be above zero", allowed: "above zero"},
		{name: "yield as force", replace: `"count": 4`, with: `"count": 4, "yield": "60 kip"`, pointer: "/layout/longitudinal/0/yield", detail: `has the unit "kip"`, allowed: "a stress in"},
		{name: "yield of side bars", replace: bottom, with: bottom + `, {"bar": "#4", "count": 2, "face": "side", "spacing": "6 in", "yield": "60 ksi"}`, pointer: "/layout/longitudinal/1/yield", detail: "yield does not belong to a row of side bars"},
		{name: "two yields of like bars", replace: bottom, with: bottom + `, {"bar": "#9", "count": 2, "face": "bottom", "layer": 1, "yield": "80 ksi"}`, pointer: "/layout/longitudinal", detail: "two yield strengths", allowed: "one yield strength for each size in a layer"},
		{name: "layer too far", replace: `"layer": 1`, with: `"layer": 21`, pointer: "/layout/longitudinal/0/layer", detail: "layer is 21", allowed: "a whole number from 1 to 20"},

		{name: "flat stirrups", replace: zone, with: zone + `, "angle": 10`, pointer: "/layout/transverse/0/angle", detail: "angle is 10", allowed: "a number from 15 to 90"},
		{name: "stirrups that lean back", replace: zone, with: zone + `, "angle": 135`, pointer: "/layout/transverse/0/angle", detail: "angle is 135", allowed: "a number from 15 to 90"},
		{name: "unknown form", replace: zone, with: zone + `, "form": "spiral"`, pointer: "/layout/transverse/0/form", detail: `form is "spiral"`, allowed: "closed, open"},

		{name: "bent bar of no size", request: bent, replace: `"bar": "#8"`, with: `"bar": "#12"`, pointer: "/layout/bent/0/bar", detail: `"#12"`, allowed: "a size of astm-inch"},
		{name: "no bent bars", request: bent, replace: `"#8", "count": 2`, with: `"#8", "count": 0`, pointer: "/layout/bent/0/count", detail: "count is 0", allowed: "a whole number from 1 to 200"},
		{name: "bent bars nowhere", request: bent, replace: `"at": "3 ft", `, with: ``, pointer: "/layout/bent/0/at", detail: "at is missing", allowed: "a length in"},
		{name: "bent bars beyond the span", request: bent, replace: `"at": "3 ft"`, with: `"at": "30 ft"`, pointer: "/layout/bent/0/at", detail: "place is 360 in", allowed: "0 in to 324 in"},
		{name: "bent bars at no angle", request: bent, replace: `"angle": 45, `, with: ``, pointer: "/layout/bent/0/angle", detail: "angle is missing", allowed: "a number from 15 to 90"},
		{name: "bent bars that lie flat", request: bent, replace: `"angle": 45`, with: `"angle": 5`, pointer: "/layout/bent/0/angle", detail: "angle is 5", allowed: "a number from 15 to 90"},
		{name: "bent bars that rise up", request: bent, replace: `"rises": "left"`, with: `"rises": "up"`, pointer: "/layout/bent/0/rises", detail: `rises is "up"`, allowed: "left, right"},
		{name: "bent bars in a span there is not", request: bent, replace: `"rises": "left"`, with: `"rises": "left", "span": 2`, pointer: "/layout/bent/0/span", detail: "span is 2", allowed: "1 to 1"},
		{name: "bends without spacing", request: bent, replace: `, "spacing": "10 in"`, with: ``, pointer: "/layout/bent/0/spacing", detail: "spacing is missing; bars bent at more than one place need it", allowed: "a length, e.g."},
		{name: "spacing of one bend", request: bent, replace: `"bends": 2`, with: `"bends": 1`, pointer: "/layout/bent/0/spacing", detail: "spacing belongs to bars bent at more than one place"},
		{name: "bends on the spot", request: bent, replace: `"spacing": "10 in"`, with: `"spacing": "0 in"`, pointer: "/layout/bent/0/spacing", detail: "it must be above zero", allowed: "above zero"},
		{name: "bent bars without spans", request: strings.Replace(bent, goodBrief, goodDemands, 1), replace: `"rises": "left"`, with: `"rises": "right"`, pointer: "/layout/bent/0", detail: "demands have none", allowed: "a brief with spans"},
	}
}

func onBareSections() []badInput {
	t := of(goodStrengths, tee)
	const form = `"diameter": "0.375 in"`
	const bent = `"bent": {"area": "1.58 in2", "yield": "60 ksi", "angle": 45}, "demand"`
	return []badInput{
		{name: "tee without web", request: t, replace: `"web_width": "14 in", `, with: ``, pointer: "/section/web_width", detail: "web_width is missing; a tee section needs it"},
		{name: "bare slab", request: t, replace: `"flange_width": "48 in"`, with: `"slab": {"clear_left": "7 ft", "clear_right": "7 ft"}`, pointer: "/section/slab", detail: "slab does not belong to a bare section", allowed: "a flange_width"},
		{name: "flange below the web", request: t, replace: `"48 in"`, with: `"8 in"`, pointer: "/section/flange_width", detail: "flange width is 8 in", allowed: "no less than the web, 14 in"},
		{name: "flange of the whole depth", request: t, replace: `"5 in"`, with: `"25 in"`, pointer: "/section/flange_thickness", detail: "flange thickness is 25 in", allowed: "less than the depth"},
		{name: "hollow through the side", request: of(goodStrengths, box), replace: `{"x": "17 in", "y": "23 in"}`, with: `{"x": "27 in", "y": "23 in"}`, pointer: "/section/voids/0", detail: "a void is no hollow of the section"},
		{name: "single leg", replace: form, with: form + `, "legs": 1`, pointer: "/stirrups/legs", detail: "legs is 1", allowed: "a whole number from 2 to 12"},
		{name: "flat stirrups", replace: form, with: form + `, "angle": 5`, pointer: "/stirrups/angle", detail: "angle is 5", allowed: "a number from 15 to 90"},
		{name: "unknown form", replace: form, with: form + `, "form": "hoop"`, pointer: "/stirrups/form", detail: `form is "hoop"`, allowed: "closed, open"},
		{name: "bent steel of no area", replace: `"demand"`, with: strings.Replace(bent, `"1.58 in2"`, `"0 in2"`, 1), pointer: "/bent/area", detail: "it must be above zero", allowed: "above zero"},
		{name: "bent steel as length", replace: `"demand"`, with: strings.Replace(bent, `"1.58 in2"`, `"1.58 in"`, 1), pointer: "/bent/area", detail: `has the unit "in"`, allowed: "an area in"},
		{name: "bent steel at no angle", replace: `"demand"`, with: strings.Replace(bent, `, "angle": 45`, ``, 1), pointer: "/bent/angle", detail: "angle is missing", allowed: "a number from 15 to 90"},
		{name: "bent steel that lies flat", replace: `"demand"`, with: strings.Replace(bent, `45`, `4.5`, 1), pointer: "/bent/angle", detail: "angle is 4.5", allowed: "a number from 15 to 90"},
		{name: "bent steel without yield", replace: `"demand"`, with: strings.Replace(bent, `"yield": "60 ksi", `, ``, 1), pointer: "/bent/yield", detail: "yield is missing", allowed: "a stress in"},
		{name: "bent steel on the spot", replace: `"demand"`, with: strings.Replace(bent, `45}`, `45, "spacing": "0 in"}`, 1), pointer: "/bent/spacing", detail: "it must be above zero", allowed: "above zero"},
		{name: "torque without cover", replace: `"cover": "1.5 in", "diameter": "0.375 in"},
  "demand": {"moment": "250 kip-ft", "shear": "45 kip", "torque": "0 kip-ft"`, with: `"diameter": "0.375 in"},
  "demand": {"moment": "250 kip-ft", "shear": "45 kip", "torque": "30 kip-ft"`, pointer: "/stirrups/cover", detail: "the torque must be designed for, and the stirrups' cover is missing", allowed: "above zero"},
		{name: "steep angle", replace: `"bending"`, with: `"torsion_angle": 85, "bending"`, pointer: "/torsion_angle", detail: "torsion_angle is 85", allowed: "a number from 10 to 80"},
		{name: "path of no torque", replace: `, "torque": "0 kip-ft"`, with: `, "path": "equilibrium"`, pointer: "/demand/path", detail: "path belongs to a torque"},
	}
}
