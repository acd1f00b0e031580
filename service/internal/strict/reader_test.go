package strict_test

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/service/internal/strict"
	"soffit.example/units"
)

type sample struct {
	Name   string         `json:"name,omitzero" validate:"max=5"`
	Kind   *string        `json:"kind,omitzero" validate:"omitnil,oneof=round flat-topped"`
	Width  units.Length   `json:"width"`
	Cover  *units.Length  `json:"cover,omitzero"`
	Spans  []units.Length `json:"spans,omitzero" validate:"omitnil,min=1,max=3"`
	Layers []layer        `json:"layers" validate:"min=1,max=2,dive"`
	Sizes  []string       `json:"sizes,omitzero" validate:"omitnil,min=1,max=3,dive,max=4"`
	Loose  *bool          `json:"loose,omitzero"`
}

type layer struct {
	Count int      `json:"count" validate:"min=1,max=40"`
	Share *float64 `json:"share,omitzero" validate:"omitnil,min=0,max=1"`
}

var limits = strict.Limits{Depth: 8, Values: 200, Faults: 20}

func TestReadKeepsWhatWasGiven(t *testing.T) {
	faults := strict.Faults{Most: 20}
	v, err := strict.NewReader[sample](limits).Read([]byte(`{"width": "14 in", "cover": {"value": 2, "unit": "in"},
		"spans": ["20 ft", "6 m"], "layers": [{"count": 3, "share": 0.5}], "kind": "round", "loose": false}`), &faults)
	require.NoError(t, err)
	require.Empty(t, faults.All())
	require.Equal(t, units.Inch.Of(14), v.Width)
	require.Equal(t, units.Inch.Of(2), *v.Cover)
	require.Equal(t, []units.Length{units.Foot.Of(20), units.Metre.Of(6)}, v.Spans)
	require.Equal(t, 3, v.Layers[0].Count)
	require.Equal(t, 0.5, *v.Layers[0].Share)
	require.Equal(t, "round", *v.Kind)
	require.False(t, *v.Loose)
}

func TestReadListsEveryFault(t *testing.T) {
	faults := strict.Faults{Most: 20}
	_, err := strict.NewReader[sample](limits).Read([]byte(`{"name": "toolong", "widht": 1, "kind": "flattopped", "cover": 14,
		"spans": ["20 ft", null, "6 kip", {"value": 3}], "layers": [{"count": 1.5}, {"count": 41, "share": 2}, {}], "sizes": [], "loose": "no"}`), &faults)
	require.NoError(t, err)
	require.Equal(t, []strict.Fault{}, faults.All())
}
