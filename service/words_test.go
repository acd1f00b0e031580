package service

import (
	"reflect"
	"strings"
	"testing"

	"github.com/stretchr/testify/require"

	"soffit.example/beam"
	"soffit.example/service/internal/wire"
)

// wordsOf lists the words that a member of a wire type admits.
func wordsOf(t *testing.T, zero any, member string) []string {
	typ := reflect.TypeOf(zero)
	for i := range typ.NumField() {
		f := typ.Field(i)
		name, _, _ := strings.Cut(f.Tag.Get("json"), ",")
		if name != member {
			continue
		}
		_, list, ok := strings.Cut(f.Tag.Get("validate"), "oneof=")
		require.True(t, ok, "%s has no words", member)
		return strings.Fields(list)
	}
	require.Fail(t, "no member", "%s.%s", typ, member)
	return nil
}

// enumeration lists the words of an enumeration of package beam.
func enumeration[E interface {
	~uint8
	String() string
}]() []string {
	var list []string
	for e := E(1); e.String() != ""; e++ {
		list = append(list, e.String())
	}
	return list
}

// The door admits the words of package beam's enumerations, all and no
// others: a word that the ranges let through is never lost in conversion.
func TestTheDoorAdmitsTheWordsOfTheModel(t *testing.T) {
	for _, tc := range []struct {
		zero   any
		member string
		want   []string
	}{
		{wire.Section{}, "shape", enumeration[beam.Shape]()},
		{wire.Brief{}, "exposure", enumeration[beam.Exposure]()},
		{wire.Concrete{}, "kind", enumeration[beam.ConcreteKind]()},
		{wire.Reinforcement{}, "coating", enumeration[beam.Coating]()},
		{wire.Load{}, "case", enumeration[beam.LoadCase]()},
		{wire.Load{}, "shape", enumeration[beam.LoadShape]()},
		{wire.Serviceability{}, "attached", enumeration[beam.Attachment]()},
		{wire.Preferences{}, "prefer", enumeration[beam.Preference]()},
		{wire.Brief{}, "shear_row", enumeration[beam.ShearRow]()},
		{wire.Brief{}, "shear_method", enumeration[beam.ShearMethod]()},
		{wire.StrengthsRequest{}, "bending", enumeration[beam.Sense]()},
		{wire.Row{}, "face", enumeration[beam.Face]()},
		{wire.Load{}, "path", enumeration[beam.TorquePath]()},
		{wire.Demand{}, "path", enumeration[beam.TorquePath]()},
	} {
		require.Equal(t, tc.want, wordsOf(t, tc.zero, tc.member), tc.member)
	}
	var supports []string
	for _, k := range supportKinds() {
		supports = append(supports, k.String())
	}
	require.Equal(t, supports, wordsOf(t, wire.Support{}, "kind"))
}

// Every shape has its rule, so that none is looked up in vain.
func TestEveryShapeHasItsRule(t *testing.T) {
	require.Len(t, sectionRules[1:], len(enumeration[beam.Shape]()))
	require.Len(t, loadRules[1:], len(enumeration[beam.LoadShape]()))
}

// A layout that comes out can go in: replies have no member that requests
// lack.
func TestLayoutsGoRound(t *testing.T) {
	members := func(zero any) (names []string) {
		typ := reflect.TypeOf(zero)
		for i := range typ.NumField() {
			name, _, _ := strings.Cut(typ.Field(i).Tag.Get("json"), ",")
			names = append(names, name)
		}
		return names
	}
	require.Equal(t, members(wire.Layout{}), members(wire.LayoutReply{}))
	require.Equal(t, members(wire.Row{}), members(wire.RowReply{}))
	require.Equal(t, members(wire.Zone{}), members(wire.ZoneReply{}))
	require.Equal(t, members(wire.Bent{}), members(wire.BentReply{}))
}
