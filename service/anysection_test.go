package service_test

import (
	"fmt"
	"net/http"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"
	"pgregory.net/rapid"

	"soffit.example/service/internal/wire"
)

// anySection draws a section, sound or next to it: of every shape, with
// members left out, of other shapes, and at and beyond their limits.
func anySection(t *rapid.T) string {
	inches := func(name string, least, most float64) string {
		return fmt.Sprintf(`"%s": "%.3g in"`, name, rapid.Float64Range(least, most).Draw(t, name))
	}
	shape := rapid.SampledFrom([]string{"rectangular", "tee", "ell", "inverted-tee", "polygon"}).Draw(t, "shape")
	members := []string{fmt.Sprintf(`"shape": %q`, shape)}
	add := func(m ...string) { members = append(members, m...) }
	switch shape {
	case "rectangular":
		add(inches("width", 1, 60), inches("depth", 1, 60))
	case "polygon":
		corner := func(x, y float64) string { return fmt.Sprintf(`{"x": "%.4g in", "y": "%.4g in"}`, x, y) }
		wide, deep := rapid.Float64Range(4, 50).Draw(t, "wide"), rapid.Float64Range(4, 60).Draw(t, "deep")
		lean := rapid.Float64Range(-20, 20).Draw(t, "lean")
		add(fmt.Sprintf(`"outline": [%s, %s, %s, %s]`, corner(0, 0), corner(wide, 0), corner(wide+lean, deep), corner(-lean, deep)))
		if rapid.Bool().Draw(t, "hollow") {
			wall := rapid.Float64Range(0.5, 12).Draw(t, "wall")
			add(fmt.Sprintf(`"voids": [[%s, %s, %s, %s]]`, corner(wall, wall), corner(wide-wall, wall), corner(wide-wall, deep-wall), corner(wall, deep-wall)))
		}
	default:
		add(inches("web_width", 2, 40), inches("depth", 6, 60), inches("flange_thickness", 1.5, 16), inches("flange_width", 4, 120))
	}
	if shape == "tee" && rapid.Bool().Draw(t, "isolated") {
		add(`"isolated": true`)
	}
	if rapid.IntRange(0, 4).Draw(t, "joist") == 0 {
		add(`"joist": true`)
	}
	return "{" + strings.Join(members, ", ") + "}"
}

// anySteel draws layers, stirrups and bent bars for a section.
func anySteel(t *rapid.T) string {
	var layers []string
	for i := range rapid.IntRange(1, 6).Draw(t, "layers") {
		yield := rapid.SampledFrom([]int{40, 60, 80}).Draw(t, "yield")
		layers = append(layers, fmt.Sprintf(`{"area": "%.3g in2", "depth": "%.3g in", "yield": "%d ksi"}`,
			rapid.Float64Range(0.1, 12).Draw(t, fmt.Sprint("area ", i)), rapid.Float64Range(1, 40).Draw(t, fmt.Sprint("depth ", i)), yield))
	}
	s := `"layers": [` + strings.Join(layers, ", ") + `]`
	if rapid.Bool().Draw(t, "stirrups") {
		s += fmt.Sprintf(`, "stirrups": {"area": "%.3g in2", "spacing": "%.3g in", "yield": "60 ksi", "cover": "%.3g in", "diameter": "0.5 in", "legs": %d, "angle": %d, "form": %q}`,
			rapid.Float64Range(0.1, 2).Draw(t, "legs area"), rapid.Float64Range(2, 30).Draw(t, "spacing"), rapid.Float64Range(0.5, 4).Draw(t, "cover"),
			rapid.IntRange(2, 6).Draw(t, "legs"), rapid.SampledFrom([]int{30, 45, 60, 90}).Draw(t, "angle"), rapid.SampledFrom([]string{"closed", "open"}).Draw(t, "form"))
	}
	if rapid.IntRange(0, 3).Draw(t, "bent") == 0 {
		s += fmt.Sprintf(`, "bent": {"area": "0.88 in2", "yield": "60 ksi", "angle": %d}`, rapid.SampledFrom([]int{20, 30, 45}).Draw(t, "slope"))
	}
	return s
}

// anyStrengths draws a request for the strengths of any section.
func anyStrengths(t *rapid.T) string {
	sense, sign := "positive", ""
	if rapid.Bool().Draw(t, "hogging") {
		sense, sign = "negative", "-"
	}
	return fmt.Sprintf(`{"code": %q, "section": %s, "concrete": {"strength": "%.3g ksi", "kind": "normalweight"}, "bending": %q, %s,
  "demand": {"moment": "%s%.3g kip-ft", "shear": "%.3g kip", "torque": "%.3g kip-ft", "axial": "%.3g kip"}}`,
		rapid.SampledFrom([]string{"ACI 318-19", "ACI 318M-19", "ACI 318-14", "ACI 318M-14"}).Draw(t, "code"), anySection(t),
		rapid.Float64Range(2.5, 12).Draw(t, "strength"), sense, anySteel(t), sign, rapid.Float64Range(0, 900).Draw(t, "moment"),
		rapid.Float64Range(-150, 150).Draw(t, "shear"), rapid.Float64Range(-120, 120).Draw(t, "torque"), rapid.Float64Range(-40, 200).Draw(t, "axial"))
}

// Whatever the section, its steel and what is asked of it, the answer is a
// result or names a fault, and keeps to the document.
func TestAnySectionIsAnswered(t *testing.T) {
	s := newService(t)
	c := newContract(t, s)
	rapid.Check(t, func(t *rapid.T) {
		body := anyStrengths(t)
		in, _ := c.request("POST", "/v1/strengths", body)
		w := send(s, "POST", "/v1/strengths", body)
		require.NoError(t, c.reply(in, w), body)
		switch w.Code {
		case http.StatusOK:
			require.NotEmpty(t, decode[wire.Strengths](t, w).Verdict)
		case http.StatusUnprocessableEntity:
			require.NotEmpty(t, problemOf(t, w).Errors)
		default:
			require.Fail(t, "neither a result nor a fault", "%d %s\n%s", w.Code, w.Body, body)
		}
	})
}

// What is drawn reaches every kind of answer.
func TestAnySectionReachesEveryAnswer(t *testing.T) {
	s := newService(t)
	drawn := rapid.Custom(anyStrengths)
	answered := map[string]int{}
	for seed := range 150 {
		w := send(s, "POST", "/v1/strengths", drawn.Example(seed))
		if w.Code == http.StatusOK {
			answered[decode[wire.Strengths](t, w).Verdict]++
		} else {
			answered["fault"]++
		}
	}
	for _, kind := range []string{"fault", "unsatisfied", "out-of-scope", "satisfied"} {
		require.NotZero(t, answered[kind], "%s: %v", kind, answered)
	}
}
