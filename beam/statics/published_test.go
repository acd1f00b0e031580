package statics_test

import (
	"encoding/json"
	"os"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam/statics"
)

// TestFixedEndMoments holds the analysis against a published table of fixed-end
// moments; the source stands in the file.
func TestFixedEndMoments(t *testing.T) {
	text, err := os.ReadFile("testdata/fixed-end-moments.json")
	require.NoError(t, err)
	var table struct {
		Precision float64
		Cases     []struct {
			Name, Left, Right string
			Strips            [][4]float64 // from, to, intensity, intensity at to
			Points            [][2]float64 // at, force
			MA, MB            float64
		}
	}
	require.NoError(t, json.Unmarshal(text, &table))
	require.Len(t, table.Cases, 13)
	kinds := map[string]statics.SupportKind{"fixed": statics.Fixed, "pinned": statics.Pinned}
	for _, c := range table.Cases {
		t.Run(c.Name, func(t *testing.T) {
			var shapes []statics.Shape
			for _, s := range c.Strips {
				shapes = append(shapes, strip(s[0], s[1], s[2], s[3]))
			}
			for _, p := range c.Points {
				shapes = append(shapes, point(p[0], p[1]))
			}
			s := solve(t, oneSpan(kinds[c.Left], 1, kinds[c.Right]), one(shapes...))
			left, _ := s.at(t, 0)
			right, _ := s.at(t, 1)
			require.InDelta(t, -c.MA, inKNm(left.Moment), table.Precision/2)
			require.InDelta(t, -c.MB, inKNm(right.Moment), table.Precision/2)
			// The printed fractions are known exactly.
			require.InDelta(t, -c.MA, inKNm(left.Moment), 1e-14)
			require.InDelta(t, -c.MB, inKNm(right.Moment), 1e-14)
		})
	}
}
