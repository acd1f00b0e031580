package openapi

import (
	"fmt"
	"reflect"
	"slices"
	"strconv"
	"strings"

	"github.com/getkin/kin-openapi/openapi3"

	"soffit.example/service/internal/wire"
	"soffit.example/units"
)

// builder turns wire types into component schemas.
type builder struct {
	schemas openapi3.Schemas
	err     error // the first
}

func newBuilder() *builder { return &builder{schemas: openapi3.Schemas{}} }

func (b *builder) fail(format string, args ...any) {
	if b.err == nil {
		b.err = fmt.Errorf(format, args...)
	}
}

// ref is the schema of a wire type.
func (b *builder) ref(zero any) *openapi3.SchemaRef { return b.schema(reflect.TypeOf(zero), "") }

type quantity interface{ Amount() units.Amount }

// schema is the schema of a type under a `validate` tag. Structs become
// components.
func (b *builder) schema(t reflect.Type, rules string) *openapi3.SchemaRef {
	for t.Kind() == reflect.Pointer {
		t = t.Elem()
	}
	own, items, _ := strings.Cut(rules, "dive")
	r := readRules(own)
	zero := reflect.Zero(t).Interface()
	switch v := zero.(type) {
	case units.Measure:
		return b.component("Measure", measure)
	case units.System:
		return openapi3.NewStringSchema().WithEnum("si", "us").NewRef()
	case wire.Pattern:
		return openapi3.NewSchema().WithEnum(append([]any{false}, anys(wire.PatternWords())...)...).NewRef()
	case quantity:
		d := v.Amount().Dimension()
		return b.component(t.Name(), func() *openapi3.Schema { return input(d) })
	}
	switch t.Kind() {
	case reflect.Struct:
		return b.component(t.Name(), func() *openapi3.Schema { return b.object(t) })
	case reflect.Slice:
		s := openapi3.NewArraySchema()
		s.Items = b.schema(t.Elem(), items)
		s.MinItems, s.MaxItems = r.least, r.most
		return s.NewRef()
	case reflect.String:
		s := openapi3.NewStringSchema()
		if len(r.words) > 0 {
			return s.WithEnum(anys(r.words)...).NewRef()
		}
		s.MinLength, s.MaxLength = r.least, r.most
		return s.NewRef()
	case reflect.Int:
		s := openapi3.NewIntegerSchema()
		s.Min, s.Max = r.min, r.max
		return s.NewRef()
	case reflect.Float64:
		s := openapi3.NewFloat64Schema().WithFormat("")
		s.Min, s.Max = r.min, r.max
		return s.NewRef()
	case reflect.Bool:
		return openapi3.NewBoolSchema().NewRef()
	}
	b.fail("no schema for %s", t)
	return openapi3.NewSchema().NewRef()
}

// component adds a named schema once and refers to it.
func (b *builder) component(name string, build func() *openapi3.Schema) *openapi3.SchemaRef {
	if _, known := b.schemas[name]; !known {
		b.schemas[name] = nil // so that a type that contains itself ends
		b.schemas[name] = build().NewRef()
	}
	return openapi3.NewSchemaRef("#/components/schemas/"+name, nil)
}

func (b *builder) object(t reflect.Type) *openapi3.Schema {
	s := openapi3.NewObjectSchema().WithoutAdditionalProperties()
	for i := range t.NumField() {
		f := t.Field(i)
		name, options, _ := strings.Cut(f.Tag.Get("json"), ",")
		rules := f.Tag.Get("validate")
		if words := f.Tag.Get("enum"); words != "" {
			rules = "oneof=" + words
		}
		field := b.schema(f.Type, rules)
		if doc := f.Tag.Get("doc"); doc != "" {
			if field.Ref != "" {
				field = (&openapi3.Schema{AllOf: openapi3.SchemaRefs{field}}).NewRef()
			}
			field.Value.Description = doc
		} else if t.PkgPath() == reflect.TypeFor[wire.Brief]().PkgPath() {
			b.fail("%s.%s has no doc tag", t.Name(), f.Name)
		}
		s.Properties[name] = field
		if !strings.Contains(options, "omitzero") {
			s.Required = append(s.Required, name)
		}
	}
	return s
}

// measure is a quantity in a reply.
func measure() *openapi3.Schema {
	object := openapi3.NewObjectSchema().WithoutAdditionalProperties().
		WithProperty("value", openapi3.NewFloat64Schema().WithFormat("")).
		WithProperty("unit", openapi3.NewStringSchema().WithEnum(anys(printed())...)).
		WithRequired([]string{"value", "unit"})
	s := openapi3.NewOneOfSchema(object, openapi3.NewFloat64Schema().WithFormat(""))
	s.Description = "A quantity with its unit, or a number if it has none; at most twelve significant digits."
	return s
}

// printed lists the units of replies.
func printed() []string {
	var list []string
	for _, row := range units.Table() {
		if row.Symbol != "" {
			list = append(list, row.Symbol)
		}
	}
	slices.Sort(list)
	return slices.Compact(list)
}

// input is a quantity in a request.
func input(d units.Dimension) *openapi3.Schema {
	var symbols, read []string
	for _, row := range units.Table() {
		if row.Dimension == d {
			symbols = append(symbols, row.Symbol)
			read = append(append(read, row.Symbol), row.Aliases...)
		}
	}
	number := openapi3.NewFloat64Schema().WithFormat("")
	object := openapi3.NewObjectSchema().WithoutAdditionalProperties().
		WithProperty("value", number).
		WithProperty("unit", openapi3.NewStringSchema().WithEnum(anys(read)...)).
		WithRequired([]string{"value", "unit"})
	text := openapi3.NewStringSchema().WithMinLength(1).WithMaxLength(64)
	text.Description = "Number and unit, with fractions where wanted: 24 in, 3/4 in, 1 1/2 in."
	s := openapi3.NewOneOfSchema(object, text)
	s.Description = fmt.Sprintf("Quantity with its unit (%s): %s.", d, strings.Join(symbols, ", "))
	return s
}

// rules are what a `validate` tag says, in the forms that schemas want.
type rules struct {
	least    uint64
	most     *uint64
	min, max *float64
	words    []string
}

func readRules(tag string) rules {
	var r rules
	for part := range strings.SplitSeq(tag, ",") {
		name, param, _ := strings.Cut(part, "=")
		if name == "oneof" {
			r.words = strings.Fields(param)
			continue
		}
		v, err := strconv.ParseFloat(param, 64)
		if err != nil {
			continue
		}
		n := uint64(v)
		switch name {
		case "min":
			r.least, r.min = n, &v
		case "max":
			r.most, r.max = &n, &v
		}
	}
	return r
}

func anys(list []string) []any {
	out := make([]any, len(list))
	for i, s := range list {
		out[i] = s
	}
	return out
}
