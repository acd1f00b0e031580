package strict

import (
	"errors"
	"fmt"
	"reflect"
	"strconv"
	"strings"
	"unicode/utf8"

	json2 "github.com/go-json-experiment/json"
	"github.com/go-playground/validator/v10"
)

// Limits bound the work that one document can ask for.
type Limits struct {
	Depth  int // levels of objects and lists
	Values int // names, values and brackets
	Faults int // listed in one answer
}

// Reader reads documents into values of type T. It is safe for concurrent
// use.
type Reader[T any] struct {
	shape  *shape
	limits Limits
	rules  *validator.Validate
}

// NewReader prepares a reader. It panics if T or its tags are unsuitable,
// which is a fault of the program.
func NewReader[T any](limits Limits) *Reader[T] {
	r := &Reader[T]{
		shape:  shapeOf(reflect.TypeFor[T](), ""),
		limits: limits,
		rules:  validator.New(validator.WithRequiredStructEnabled()),
	}
	if r.shape.kind != object {
		panic(fmt.Sprintf("strict: %s is not an object", r.shape.typ))
	}
	r.rules.RegisterTagNameFunc(func(f reflect.StructField) string {
		name, _, _ := strings.Cut(f.Tag.Get("json"), ",")
		return name
	})
	var zero T
	_ = r.rules.Struct(zero) // a tag that cannot be read panics here, not in a request
	return r
}

// Read reads a document. The faults found are added to faults, and the value
// holds what was in order; the error is a *SyntaxError where there is no
// document to speak of.
func (r *Reader[T]) Read(data []byte, faults *Faults) (T, error) {
	var v T
	sound, err := walk(data, r.shape, r.limits, faults)
	if err != nil {
		return v, err
	}
	if err := json2.Unmarshal(sound, &v); err != nil {
		// The walk lets nothing through that does not decode.
		return v, fmt.Errorf("strict: decoding what was walked: %w", err)
	}
	var ranges validator.ValidationErrors
	if err := r.rules.Struct(v); errors.As(err, &ranges) {
		for _, e := range ranges {
			faults.Add(r.explain(e))
		}
	} else if err != nil {
		return v, fmt.Errorf("strict: %w", err)
	}
	return v, nil
}

// explain puts a broken rule into our words.
func (r *Reader[T]) explain(e validator.FieldError) Fault {
	path := pointerOf(e.Namespace())
	s := r.shape.at(path)
	if s == nil {
		panic(fmt.Sprintf("strict: a rule of %s speaks of %q", r.shape.typ, path))
	}
	value := reflect.Indirect(reflect.ValueOf(e.Value()))
	found := fmt.Sprintf("is %v", value)
	allowed := s.allowed()
	hint := ""
	switch s.kind {
	case list:
		found = "has " + plural(value.Len(), "item")
	case text:
		if len(s.rule.words) > 0 {
			found = fmt.Sprintf("is %q", clip([]byte(value.String())))
			if len(s.rule.words) > 1 {
				allowed = "one of " + allowed
			}
			if near := Nearest(value.String(), s.rule.words); near != "" {
				hint = fmt.Sprintf("; did you mean %q?", near)
			}
			break
		}
		found = "has " + plural(utf8.RuneCountInString(value.String()), "character")
		allowed = "text of " + s.rule.count("character")
	}
	return Fault{
		Path:    path,
		Detail:  fmt.Sprintf("%s %s; it must be %s%s", Subject(path), found, allowed, hint),
		Allowed: strings.TrimPrefix(allowed, "one of "),
	}
}

// count says in words how many things a rule asks for.
func (r rule) count(thing string) string {
	switch {
	case r.least == r.most:
		return plural(atoi(r.least), thing)
	case r.least != "" && r.most != "":
		return r.least + " to " + plural(atoi(r.most), thing)
	case r.least != "":
		return "at least " + plural(atoi(r.least), thing)
	}
	return "at most " + plural(atoi(r.most), thing)
}

func atoi(s string) int {
	n, err := strconv.Atoi(s)
	if err != nil {
		panic("strict: bound " + strconv.Quote(s) + " is not a whole number")
	}
	return n
}

func plural(n int, thing string) string {
	if n == 1 {
		return "1 " + thing
	}
	return strconv.Itoa(n) + " " + thing + "s"
}

// pointerOf turns a validator's "Brief.layers[1].count" into "/layers/1/count".
// Member names of request types hold none of these signs.
func pointerOf(namespace string) string {
	_, rest, ok := strings.Cut(namespace, ".")
	if !ok {
		return ""
	}
	return "/" + strings.NewReplacer(".", "/", "[", "/", "]", "").Replace(rest)
}
