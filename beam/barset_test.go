package beam

import (
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/bars"
	"soffit.example/units"
)

// Upper bars lie directly above lower ones (ACI 318-19 25.2.2), and a beam is
// built symmetric about its middle: an odd upper layer needs a middle bar to
// lie above.
func TestSplitLayers(t *testing.T) {
	tests := []struct {
		name            string
		n, most, layers int
		want            []int // nil: no split
	}{
		{"one layer", 4, 5, 2, []int{4}},
		{"exactly full", 5, 5, 2, []int{5}},
		{"even over even", 8, 6, 2, []int{6, 2}},
		{"odd rest moves one up", 7, 6, 2, []int{5, 2}},
		{"odd over odd", 6, 5, 2, []int{5, 1}},
		{"even over odd", 7, 5, 2, []int{5, 2}},
		{"both full", 10, 5, 2, []int{5, 5}},
		{"odd total over even layers", 11, 6, 2, nil},
		{"too many", 11, 5, 2, nil},
		{"one layer only", 6, 5, 1, nil},
		{"three layers", 12, 5, 3, []int{5, 5, 2}},
		{"three layers, odd", 13, 6, 3, []int{5, 5, 3}},
	}
	for _, tt := range tests {
		t.Run(tt.name, func(t *testing.T) {
			got, ok := splitLayers(tt.n, tt.most, tt.layers)
			require.Equal(t, tt.want != nil, ok)
			if ok {
				var want [MaxLayers]int
				copy(want[:], tt.want)
				require.Equal(t, want, got)
			}
		})
	}
}

func TestSplitsAddUp(t *testing.T) {
	for most := 2; most <= 9; most++ {
		for layers := 1; layers <= MaxLayers; layers++ {
			for n := 2; n <= most*layers+1; n++ {
				split, ok := splitLayers(n, most, layers)
				if !ok {
					continue
				}
				sum := 0
				for i, k := range split {
					sum += k
					require.LessOrEqual(t, k, most)
					if i > 0 && k > 0 {
						require.LessOrEqual(t, k, split[i-1], "a layer on a narrower one")
						require.False(t, k%2 == 1 && split[i-1]%2 == 0, "%v has an odd layer on an even one", split)
					}
				}
				require.Equal(t, n, sum, "%v of %d", split, n)
			}
		}
	}
}

func TestMixedSetsHoldTheLargerBarsOutside(t *testing.T) {
	catalog, err := bars.Lookup("astm-inch")
	require.NoError(t, err)
	large, err := catalog.Size("#8")
	require.NoError(t, err)
	small, err := catalog.Size("#7")
	require.NoError(t, err)
	sets := mixedSets(nil, &large, &small, units.Area{}, 5, 6, 2)
	require.NotEmpty(t, sets)
	for _, s := range sets {
		require.Equal(t, 2, s.sizes)
		require.Equal(t, "#8", s.layers[0][0].size.Name)
		require.Equal(t, "#8", s.largest().Name)
		total := units.Area{}
		for _, l := range s.layers {
			for _, g := range l {
				if g.count > 0 {
					total = total.Add(bars.TotalArea(bars.Group{Size: *g.size, Count: g.count}))
				}
			}
		}
		require.InEpsilon(t, total.In(units.SquareInch), s.area.In(units.SquareInch), 1e-12)
	}
}
