package strict

import (
	"bytes"
	"encoding/json"
	"errors"
	"fmt"
	"io"
	"reflect"
	"strconv"
	"strings"
	"unicode/utf8"

	"github.com/go-json-experiment/json/jsontext"
)

const (
	longestNumber = 40  // characters, so that no number costs much to read
	longestName   = 128 // bytes of a member's name
	longestQuote  = 48  // bytes of a value that a fault repeats
)

// walker reads a document token by token against a shape. What is in order it
// copies to out, so that the rest can be decoded although parts are faulty.
type walker struct {
	dec    *jsontext.Decoder
	limits Limits
	faults *Faults
	path   []byte
	out    []byte
	values int
}

// walk reads the whole of data and returns the part of it that fits s. Its
// error is a *SyntaxError.
func walk(data []byte, s *shape, limits Limits, faults *Faults) ([]byte, error) {
	w := &walker{
		dec:    jsontext.NewDecoder(bytes.NewBuffer(data)),
		limits: limits,
		faults: faults,
		out:    make([]byte, 0, len(data)+16),
	}
	ok, err := w.value(s)
	if err != nil {
		return nil, err
	}
	if _, err := w.dec.ReadToken(); err != io.EOF {
		return nil, &SyntaxError{Offset: w.dec.InputOffset(), Reason: "the document goes on after its value"}
	}
	if !ok {
		return []byte("{}"), nil
	}
	return w.out, nil
}

// fault reports a fault at the current place.
func (w *walker) fault(allowed, format string, args ...any) {
	path := string(w.path)
	w.faults.Add(Fault{Path: path, Detail: Subject(path) + " " + fmt.Sprintf(format, args...), Allowed: allowed})
}

// value reads the next value. If it has the shape s it is appended to out;
// otherwise out is as it was, the fault is noted and ok is false.
func (w *walker) value(s *shape) (ok bool, err error) {
	found := w.dec.PeekKind()
	if found == 'n' {
		w.fault(s.allowed(), "is null; leave out what is not known")
		return false, w.skip()
	}
	switch s.kind {
	case object:
		if found == '{' {
			return w.object(s)
		}
	case list:
		if found == '[' {
			return w.list(s)
		}
	case text:
		if found == '"' {
			return w.copy(nil)
		}
	case whole, number:
		if found == '0' {
			return w.copy(func(raw []byte) { w.number(s, string(raw)) })
		}
	case flag:
		if found == 't' || found == 'f' {
			return w.copy(nil)
		}
	case itself:
		return w.itself(s, found)
	}
	return false, w.misplaced(s)
}

// misplaced notes a value of another kind than s and passes over it.
func (w *walker) misplaced(s *shape) error {
	found := w.dec.PeekKind()
	if found == '{' || found == '[' {
		w.fault(s.allowed(), "is %s; it must be %s", kindWords(found), s.words())
		return w.skip()
	}
	raw, err := w.raw()
	if err == nil {
		w.fault(s.allowed(), "is %s (%s); it must be %s", kindWords(found), clip(raw), s.words())
	}
	return err
}

func (w *walker) object(s *shape) (ok bool, err error) {
	if _, err := w.token(); err != nil {
		return false, err
	}
	mark := len(w.path)
	var seen uint64
	w.out = append(w.out, '{')
	empty := len(w.out)
	for w.dec.PeekKind() != '}' {
		tok, err := w.token()
		if err != nil {
			return false, err
		}
		name := tok.String()
		if len(name) > longestName {
			return false, w.refuse("a member has a name of %d bytes; at most %d are read", len(name), longestName)
		}
		i := s.find(name)
		if i < 0 {
			w.unknown(s, name)
			if err := w.skip(); err != nil {
				return false, err
			}
			continue
		}
		seen |= 1 << i
		before := len(w.out)
		if before > empty {
			w.out = append(w.out, ',')
		}
		w.out = append(strconv.AppendQuote(w.out, name), ':') // our own names need no escapes
		w.path = appendName(w.path, name)
		ok, err := w.value(s.fields[i].shape)
		w.path = w.path[:mark]
		if err != nil {
			return false, err
		}
		if !ok {
			w.out = w.out[:before]
		}
	}
	if _, err := w.token(); err != nil {
		return false, err
	}
	w.out = append(w.out, '}')
	for i := range s.fields {
		if f := &s.fields[i]; f.required && seen&(1<<i) == 0 {
			w.path = appendName(w.path, f.name)
			w.fault(f.shape.allowed(), "is missing")
			w.path = w.path[:mark]
		}
	}
	return true, nil
}

func (w *walker) unknown(s *shape, name string) {
	mark := len(w.path)
	w.path = appendName(w.path, name)
	detail := fmt.Sprintf("%q is not a member here", clip([]byte(name)))
	if !w.faults.full() { // what is not listed need not be helpful
		if near := Nearest(name, s.names); near != "" {
			detail += fmt.Sprintf("; did you mean %q?", near)
		}
	}
	w.faults.Add(Fault{Path: string(w.path), Detail: detail, Allowed: strings.Join(s.names, ", ")})
	w.path = w.path[:mark]
}

func (w *walker) list(s *shape) (ok bool, err error) {
	if _, err := w.token(); err != nil {
		return false, err
	}
	mark := len(w.path)
	w.out = append(w.out, '[')
	for i := 0; w.dec.PeekKind() != ']'; i++ {
		if i > 0 {
			w.out = append(w.out, ',')
		}
		w.path = appendIndex(w.path, i)
		ok, err := w.value(s.item)
		w.path = w.path[:mark]
		if err != nil {
			return false, err
		}
		if !ok { // keep the place, so that later items keep their pointers
			w.out = append(w.out, s.item.blank()...)
		}
	}
	if _, err := w.token(); err != nil {
		return false, err
	}
	w.out = append(w.out, ']')
	return true, nil
}

// number notes what the literal of a plain number can be wrong in.
func (w *walker) number(s *shape, literal string) {
	if len(literal) > longestNumber {
		w.fault("", "is a number of %d characters; at most %d are read", len(literal), longestNumber)
		return
	}
	if s.kind == whole {
		if _, err := strconv.ParseInt(literal, 10, 32); err != nil {
			w.fault(s.allowed(), "is %s; it must be a whole number written with digits alone", literal)
		}
		return
	}
	if _, err := strconv.ParseFloat(literal, 64); err != nil {
		w.fault(s.allowed(), "is %s, which is out of range", literal)
	}
}

// copy appends the next value to out, unless check notes a fault.
func (w *walker) copy(check func(raw []byte)) (ok bool, err error) {
	raw, err := w.raw()
	if err != nil {
		return false, err
	}
	if check != nil {
		before := w.faults.count()
		check(raw)
		if w.faults.count() != before {
			return false, nil
		}
	}
	w.out = append(w.out, raw...)
	return true, nil
}

// itself asks the type of s to read the next value. A measure written as an
// object is walked as such first, for pointers into it.
func (w *walker) itself(s *shape, found jsontext.Kind) (ok bool, err error) {
	mark := len(w.out)
	switch {
	case found == '{' && s.measure != nil:
		before := w.faults.count()
		if ok, err := w.object(s.measure); !ok || err != nil {
			return false, err
		}
		if w.faults.count() != before {
			w.out = w.out[:mark]
			return false, nil
		}
	case found == '{' || found == '[':
		w.fault(s.wanted, "is %s; it must be %s", kindWords(found), s.wanted)
		return false, w.skip()
	default:
		if ok, err := w.copy(nil); !ok || err != nil {
			return false, err
		}
	}
	raw := w.out[mark:]
	if err := s.read(raw); err != nil {
		w.fault(s.wanted, "%v (given: %s)", err, clip(raw))
		w.out = w.out[:mark]
		return false, nil
	}
	return true, nil
}

// token reads one token and keeps to the limits.
func (w *walker) token() (jsontext.Token, error) {
	tok, err := w.dec.ReadToken()
	if err != nil {
		return tok, w.syntax(err)
	}
	if w.dec.StackDepth() > w.limits.Depth {
		return tok, w.refuse("the document is nested deeper than %d levels", w.limits.Depth)
	}
	return tok, w.counted()
}

// raw reads one value that is not an object or a list.
func (w *walker) raw() ([]byte, error) {
	raw, err := w.dec.ReadValue()
	if err != nil {
		return nil, w.syntax(err)
	}
	return raw, w.counted()
}

func (w *walker) counted() error {
	if w.values++; w.values > w.limits.Values {
		return w.refuse("the document has more than %d names and values", w.limits.Values)
	}
	return nil
}

// refuse ends the reading at the current place.
func (w *walker) refuse(format string, args ...any) *SyntaxError {
	return &SyntaxError{Path: string(w.path), Offset: w.dec.InputOffset(), Reason: fmt.Sprintf(format, args...)}
}

// skip passes over the next value, whatever it is.
func (w *walker) skip() error {
	depth := w.dec.StackDepth()
	for {
		if _, err := w.token(); err != nil {
			return err
		}
		if w.dec.StackDepth() <= depth {
			return nil
		}
	}
}

func (w *walker) syntax(err error) error {
	out := &SyntaxError{Path: string(w.path), Offset: w.dec.InputOffset()}
	var se *jsontext.SyntacticError
	if errors.As(err, &se) {
		out.Path, out.Offset = string(se.JSONPointer), se.ByteOffset
	}
	switch {
	case errors.Is(err, jsontext.ErrDuplicateName):
		out.Reason = fmt.Sprintf("the member %q is given twice", clip([]byte(Subject(out.Path))))
	case err == io.EOF:
		out.Reason = "the document is empty"
	case errors.Is(err, io.ErrUnexpectedEOF):
		out.Reason = "the document ends before it is complete"
	case se != nil && se.Err != nil:
		out.Reason = "the document is not JSON: " + strings.TrimPrefix(se.Err.Error(), "jsontext: ")
	default:
		out.Reason = "the document is not JSON"
	}
	return out
}

// blank is a value of shape s that can be decoded.
func (s *shape) blank() string {
	switch s.kind {
	case object:
		return "{}"
	case list:
		return "[]"
	case text:
		return `""`
	case whole, number:
		return "0"
	case flag:
		return "false"
	}
	blank, err := json.Marshal(reflect.Zero(s.typ).Interface())
	if err != nil {
		panic(fmt.Sprintf("strict: zero %s: %v", s.typ, err))
	}
	return string(blank)
}

// allowed says what values of shape s look like.
func (s *shape) allowed() string {
	switch s.kind {
	case object:
		return "an object with " + strings.Join(s.names, ", ")
	case text:
		if len(s.rule.words) > 0 {
			return strings.Join(s.rule.words, ", ")
		}
	case whole, number:
		if span := s.rule.span(); span != "" {
			return s.words() + " " + span
		}
	case list:
		if s.rule.least != "" || s.rule.most != "" {
			return "a list of " + s.rule.count("item")
		}
	case itself:
		return s.wanted
	}
	return s.words()
}

// span is the range of a rule in words; empty if there is none.
func (r rule) span() string {
	switch {
	case r.least != "" && r.most != "":
		return "from " + r.least + " to " + r.most
	case r.least != "":
		return "of at least " + r.least
	case r.most != "":
		return "of at most " + r.most
	}
	return ""
}

func kindWords(k jsontext.Kind) string {
	switch k {
	case '{':
		return "an object"
	case '[':
		return "a list"
	case '"':
		return "text"
	case '0':
		return "a number"
	}
	return "true or false"
}

// clip shortens what a fault repeats of the input.
func clip(raw []byte) string {
	if len(raw) <= longestQuote {
		return string(raw)
	}
	cut := longestQuote
	for cut > 0 && !utf8.RuneStart(raw[cut]) {
		cut--
	}
	return string(raw[:cut]) + "…"
}

func orList(words []string) string {
	if len(words) < 2 {
		return strings.Join(words, "")
	}
	return strings.Join(words[:len(words)-1], ", ") + " or " + words[len(words)-1]
}
