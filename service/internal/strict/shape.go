package strict

import (
	"encoding/json"
	"errors"
	"fmt"
	"reflect"
	"strings"

	"soffit.example/units"
)

// kind is the JSON form of a Go type.
type kind uint8

const (
	object kind = iota + 1
	list
	text
	whole
	number
	flag
	itself // reads itself: it has an UnmarshalJSON method
)

// shape is what the walk knows of a Go type.
type shape struct {
	kind   kind
	typ    reflect.Type
	fields []field // of an object, in the order of the struct
	names  []string
	item   *shape // of a list
	rule   rule
	// object form of a type that reads itself, if it is a quantity; wanted
	// is its dimension in words.
	measure *shape
	wanted  string
}

type field struct {
	name     string
	required bool
	shape    *shape
}

// mostFields is what the walk can tick off.
const mostFields = 64

// rule is the part of a `validate` tag that error messages quote.
type rule struct {
	least, most string // empty: unbounded
	words       []string
}

var unmarshaler = reflect.TypeFor[json.Unmarshaler]()

// shapeOf derives the shape of a type and its `validate` tag. Request types
// are written by hand and finite, so an unsuitable one is a fault of the
// program.
func shapeOf(t reflect.Type, tag string) *shape {
	for t.Kind() == reflect.Pointer {
		t = t.Elem()
	}
	own, items, _ := strings.Cut(tag, "dive")
	s := &shape{typ: t, rule: ruleOf(own)}
	if reflect.PointerTo(t).Implements(unmarshaler) {
		s.kind = itself
		s.describe()
		return s
	}
	switch t.Kind() {
	case reflect.Struct:
		s.kind = object
		if t.NumField() > mostFields {
			panic(fmt.Sprintf("strict: %s has more than %d fields", t, mostFields))
		}
		for i := range t.NumField() {
			f := t.Field(i)
			name, options, _ := strings.Cut(f.Tag.Get("json"), ",")
			if name == "" || f.Anonymous {
				panic(fmt.Sprintf("strict: %s.%s needs a json name", t, f.Name))
			}
			s.fields = append(s.fields, field{
				name:     name,
				required: !strings.Contains(options, "omitzero"),
				shape:    shapeOf(f.Type, f.Tag.Get("validate")),
			})
			s.names = append(s.names, name)
		}
	case reflect.Slice:
		s.kind, s.item = list, shapeOf(t.Elem(), items)
	case reflect.String:
		s.kind = text
	case reflect.Int:
		s.kind = whole
	case reflect.Float64:
		s.kind = number
	case reflect.Bool:
		s.kind = flag
	default:
		panic(fmt.Sprintf("strict: no JSON form for %s", t))
	}
	return s
}

// describe asks a type that reads itself what it reads.
func (s *shape) describe() {
	if a, ok := reflect.Zero(s.typ).Interface().(interface{ Allowed() string }); ok {
		s.wanted = a.Allowed()
		return
	}
	var pe *units.ParseError
	if !errors.As(s.read([]byte(`""`)), &pe) {
		panic(fmt.Sprintf("strict: %s does not say what it reads", s.typ))
	}
	s.wanted = withArticle(pe.Dimension.String()) + " in " + orList(pe.Accepted)
	s.measure = &shape{kind: object, names: []string{"value", "unit"}, fields: []field{
		{name: "value", required: true, shape: &shape{kind: number}},
		{name: "unit", required: true, shape: &shape{kind: text, rule: rule{words: pe.Accepted}}},
	}}
}

func withArticle(noun string) string {
	if strings.HasPrefix(noun, "a") {
		return "an " + noun
	}
	return "a " + noun
}

// read asks the type of s whether it can read a value.
func (s *shape) read(raw []byte) error {
	return reflect.New(s.typ).Interface().(json.Unmarshaler).UnmarshalJSON(raw)
}

func ruleOf(tag string) rule {
	var r rule
	for part := range strings.SplitSeq(tag, ",") {
		name, param, _ := strings.Cut(part, "=")
		switch name {
		case "min":
			r.least = param
		case "max":
			r.most = param
		case "oneof":
			r.words = strings.Fields(param)
		}
	}
	return r
}

// find is the index of a member, or -1.
func (s *shape) find(name string) int {
	for i := range s.fields {
		if s.fields[i].name == name {
			return i
		}
	}
	return -1
}

// at follows a pointer from s; nil if it leads nowhere.
func (s *shape) at(path string) *shape {
	for name := range strings.SplitSeq(strings.TrimPrefix(path, "/"), "/") {
		if s.kind == list {
			s = s.item
			continue
		}
		i := s.find(name)
		if i < 0 {
			return nil
		}
		s = s.fields[i].shape
	}
	return s
}

// words names the JSON form, with its article.
func (s *shape) words() string {
	switch s.kind {
	case object:
		return "an object"
	case list:
		return "a list"
	case text:
		return "text"
	case whole:
		return "a whole number"
	case number:
		return "a number"
	case flag:
		return "true or false"
	}
	return "a value"
}
