package aci318

import (
	"errors"
	"math"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/units"
)

// Every number of a query is taken up to both of its bounds, and beyond them is a
// fault that says the value and what is allowed. The bounds are the program's own.
func TestBoundsOfAQuery(t *testing.T) {
	area := func(set func(q *beam.SectionQuery, a units.Area)) func(*beam.SectionQuery, float64) {
		return func(q *beam.SectionQuery, v float64) { set(q, units.SquareMillimetre.Of(v)) }
	}
	length := func(set func(q *beam.SectionQuery, l units.Length)) func(*beam.SectionQuery, float64) {
		return func(q *beam.SectionQuery, v float64) { set(q, units.Millimetre.Of(v)) }
	}
	stress := func(set func(q *beam.SectionQuery, s units.Stress)) func(*beam.SectionQuery, float64) {
		return func(q *beam.SectionQuery, v float64) { set(q, units.Megapascal.Of(v)) }
	}
	for _, tc := range []struct {
		path        string
		least, most float64
		set         func(q *beam.SectionQuery, v float64)
	}{
		{"/concrete/strength", 1, 250, stress(func(q *beam.SectionQuery, s units.Stress) { q.Concrete.Strength = s })},
		{"/layers/1/area", 1, 1e6, area(func(q *beam.SectionQuery, a units.Area) { q.Layers[1].Area = a })},
		{"/layers/1/yield", 1, 1500, stress(func(q *beam.SectionQuery, s units.Stress) { q.Layers[1].Yield = s })},
		{"/stirrups/area", 1, 1e6, area(func(q *beam.SectionQuery, a units.Area) { q.Stirrups.Area = a })},
		{"/stirrups/spacing", 1, 10000, length(func(q *beam.SectionQuery, l units.Length) { q.Stirrups.Spacing = l })},
		{"/stirrups/yield", 1, 1500, stress(func(q *beam.SectionQuery, s units.Stress) { q.Stirrups.Yield = s })},
		{"/stirrups/cover", 0, 10000, length(func(q *beam.SectionQuery, l units.Length) { q.Stirrups.Cover = l })},
		{"/stirrups/diameter", 0, 10000, length(func(q *beam.SectionQuery, l units.Length) { q.Stirrups.Diameter = l })},
		{"/stirrups/across", 0, 10000, length(func(q *beam.SectionQuery, l units.Length) { q.Stirrups.Across = l })},
		{"/demand/shear", -1e6, 1e6, func(q *beam.SectionQuery, v float64) { q.Demand.Shear = units.Kilonewton.Of(v) }},
		{"/demand/torque", -1e7, 1e7, func(q *beam.SectionQuery, v float64) { q.Demand.Torque = units.KilonewtonMetre.Of(v) }},
		{"/demand/axial", -1e6, 1e6, func(q *beam.SectionQuery, v float64) { q.Demand.Axial = units.Kilonewton.Of(v) }},
		{"/demand/moment", 0, 1e7, func(q *beam.SectionQuery, v float64) { q.Demand.Moment = units.KilonewtonMetre.Of(v) }},
	} {
		e := ACI31819M().e
		faulty := func(v float64) *beam.Fault {
			q := query()
			q.Layers = append([]beam.SteelLayer(nil), q.Layers...)
			q.Section.Shape = beam.Rectangular
			tc.set(&q, v)
			_, faults := e.queryFaults(&q)
			for i := range faults {
				if faults[i].Path == tc.path {
					return &faults[i]
				}
			}
			return nil
		}
		slip := (tc.most - tc.least) * 1e-5
		require.Nil(t, faulty(tc.least), tc.path)
		require.Nil(t, faulty(tc.most), tc.path)
		for _, v := range []float64{tc.least - slip, tc.most + slip} {
			f := faulty(v)
			require.NotNil(t, f, tc.path)
			require.Regexp(t, ` -?[0-9.]+ `, f.Detail)
			require.NotEmpty(t, f.Allowed)
		}
	}
	// A moment against the sense asked for is a fault however small.
	for sense, moment := range map[beam.Sense]float64{beam.Positive: -1e-3, beam.Negative: 1e-3} {
		q := query()
		q.Bending, q.Demand.Moment = sense, units.NewtonMetre.Of(moment)
		_, err := ACI31819().Strengths(q)
		var input *beam.InputError
		require.True(t, errors.As(err, &input))
		require.Equal(t, "/demand/moment", input.Faults[0].Path)
	}
}

// A hundred layers are read, one more is not.
func TestMostLayersOfAQuery(t *testing.T) {
	q := query()
	layer := q.Layers[0]
	layer.Area = in2(0.03)
	q.Layers = nil
	for range 100 {
		q.Layers = append(q.Layers, layer)
	}
	_, err := ACI31819().Strengths(q)
	require.NoError(t, err)
	q.Layers = append(q.Layers, layer)
	_, err = ACI31819().Strengths(q)
	var input *beam.InputError
	require.True(t, errors.As(err, &input))
	require.Equal(t, "1 to 100", input.Faults[0].Allowed)
}

// What a query leaves out is filled, and said.
func TestWhatAQueryLeavesOut(t *testing.T) {
	want, err := ACI31819().Strengths(query())
	require.NoError(t, err)
	q := query()
	q.Bending, q.Section.Shape, q.Concrete.Kind = 0, 0, 0
	s, err := ACI31819().Strengths(q)
	require.NoError(t, err)
	require.Equal(t, want.Flexure, s.Flexure)
	require.Equal(t, want.Shear, s.Shear)
	require.Len(t, s.Notes, len(want.Notes)+1, "%q", s.Notes)
	require.Contains(t, s.Notes[0], "taken as positive")
	require.Empty(t, want.Notes[1:])
}

// Notes of a query, and the notes that it does not need.
func TestNotesOfAQuery(t *testing.T) {
	said := func(edit func(q *beam.SectionQuery)) []string {
		q := teeQuery()
		q.Concrete.Kind = beam.Normalweight
		edit(&q)
		s, err := ACI31819().Strengths(q)
		require.NoError(t, err)
		return s.Notes
	}
	const width, spread, least = "the flange width is taken as given", "24.3.4 spreads", "lesser of bf and 2bw"
	require.Len(t, said(func(q *beam.SectionQuery) {}), 1)
	require.Contains(t, said(func(q *beam.SectionQuery) {})[0], width)
	hogging := said(func(q *beam.SectionQuery) { q.Bending = beam.Negative })
	require.Len(t, hogging, 3)
	require.Contains(t, hogging[0], least)
	require.Contains(t, hogging[1], width)
	require.Contains(t, hogging[2], spread)
	require.Empty(t, said(func(q *beam.SectionQuery) { q.Section = rectangle(in(14), in(24)) }))
	pulled := said(func(q *beam.SectionQuery) {
		q.Section = rectangle(in(14), in(24))
		q.Demand.Axial = units.Kip.Of(-400)
	})
	require.Len(t, pulled, 1)
	require.Contains(t, pulled[0], "nothing balances the section")
	isolated := teeQuery()
	isolated.Section.Isolated, isolated.Demand = true, beam.Demand{Name: "only", Moment: units.KipFoot.Of(10)}
	s, err := ACI31819().Strengths(isolated)
	require.NoError(t, err)
	require.Equal(t, "only", checkOf(t, s.Checks, "flange.isolated").Combination)
}

// Least steel of a query goes by the least of its yield strengths, whichever layer
// it is, and so does the steel required; φ of that by the greatest that pulls.
func TestLeastSteelOfAQueryOfGrades(t *testing.T) {
	for _, weak := range []int{0, 1} {
		q := teeQuery()
		q.Section = rectangle(in(12), in(24))
		q.Layers = layersAt([2]float64{0.2, 21}, [2]float64{0.2, 21})
		q.Layers[1-weak].Yield = psi(80000)
		q.Demand = beam.Demand{Moment: units.KipFoot.Of(20)}
		s, err := ACI31819().Strengths(q)
		require.NoError(t, err)
		require.InEpsilon(t, 200.0/60000*12*21, s.Flexure.MinimumSteel.In(units.SquareInch), 1e-9)
		c := checkOf(t, s.Checks, "flexure.minimum.positive")
		require.Equal(t, "9.6.1.3", c.Clause)
		// 0.9 × 40.8 a (21 - a/2) = 240 kip-in.
		a := 21 - math.Sqrt(21*21-2*240/(0.9*40.8))
		require.InEpsilon(t, 4.0/3*40.8*a/60, valueIn(t, c.Demand, "in2"), 1e-9)
	}
}
