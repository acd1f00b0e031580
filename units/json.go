package units

import (
	"bytes"
	"encoding/json"
	"errors"
	"fmt"
	"io"
)

// jsonSpace is what JSON takes for white space.
const jsonSpace = " \t\r\n"

func marshalText(d Dimension, v float64) ([]byte, error) {
	if !inRange(v) {
		return nil, notReadable(v)
	}
	b := appendNumber(nil, v, lossless)
	b = append(b, ' ')
	return append(b, symbolOf(d, 0)...), nil
}

func marshalJSON(d Dimension, v float64) ([]byte, error) {
	if !inRange(v) {
		return nil, notReadable(v)
	}
	number := appendNumber(nil, v, lossless)
	if d == None {
		return number, nil
	}
	return appendObject(nil, number, symbolOf(d, 0)), nil
}

// notReadable is the error of recording what could not be read back.
func notReadable(v float64) error {
	return fmt.Errorf("units: cannot record %v: not of a magnitude from %g to %g", v, leastMagnitude, mostMagnitude)
}

func appendObject(dst, number []byte, symbol string) []byte {
	dst = append(dst, `{"value":`...)
	dst = append(dst, number...)
	dst = append(dst, `,"unit":`...)
	dst = appendString(dst, symbol)
	return append(dst, '}')
}

// appendString appends s as JSON.
func appendString(dst []byte, s string) []byte {
	b, err := json.Marshal(s)
	if err != nil {
		panic(err) // no string fails to marshal
	}
	return append(dst, b...)
}

// unmarshalJSON reads an object or a string as a quantity of dimension d.
func unmarshalJSON(d Dimension, data []byte) (float64, error) {
	data = bytes.Trim(data, jsonSpace)
	if len(data) == 0 {
		return 0, refuse(d, "", "is empty; write e.g. %s", example(d))
	}
	text := string(data[:min(len(data), maxText)])
	switch data[0] {
	case '"':
		var s string
		if err := json.Unmarshal(data, &s); err != nil {
			return 0, refuse(d, text, "is not JSON: %v", err)
		}
		return parse(d, s)
	case '{':
		number, symbol, err := readObject(data)
		if err != nil {
			return 0, refuse(d, text, "%v", err)
		}
		return valueOf(d, number, symbol)
	}
	if isJSONNumber(string(data)) {
		return 0, needsUnit(d, text)
	}
	return 0, refuse(d, text, `must be an object with "value" and "unit", or a string, e.g. %s`, example(d))
}

// readObject reads {"value": number, "unit": string} and nothing else. Its
// errors are clauses without subject.
func readObject(data []byte) (number, symbol string, err error) {
	dec := json.NewDecoder(bytes.NewReader(data))
	dec.UseNumber()
	if tok, err := dec.Token(); err != nil || tok != json.Delim('{') {
		return "", "", errors.New(`must be an object with "value" and "unit"`)
	}
	seen := map[string]bool{}
	for dec.More() {
		key, err := dec.Token()
		if err != nil {
			return "", "", fmt.Errorf("is not JSON: %w", err)
		}
		k, _ := key.(string)
		if seen[k] {
			return "", "", fmt.Errorf("has the key %.32q twice", k)
		}
		seen[k] = true
		tok, err := dec.Token()
		if err != nil {
			return "", "", fmt.Errorf("is not JSON: %w", err)
		}
		switch k {
		case "value":
			n, ok := tok.(json.Number)
			if !ok {
				return "", "", errors.New(`has a "value" that is not a number`)
			}
			number = string(n)
		case "unit":
			s, ok := tok.(string)
			if !ok {
				return "", "", errors.New(`has a "unit" that is not a string`)
			}
			symbol = s
		default:
			return "", "", fmt.Errorf(`has the unknown key %.32q beside "value" and "unit"`, k)
		}
	}
	if _, err := dec.Token(); err != nil {
		return "", "", fmt.Errorf("is not JSON: %w", err)
	}
	if _, err := dec.Token(); err != io.EOF {
		return "", "", errors.New("has something after its object")
	}
	for _, k := range []string{"value", "unit"} {
		if !seen[k] {
			return "", "", fmt.Errorf("lacks %q", k)
		}
	}
	return number, symbol, nil
}

// isJSONNumber reports whether s is a number in the grammar of JSON.
func isJSONNumber(s string) bool {
	return s != "" && (s[0] == '-' || '0' <= s[0] && s[0] <= '9') &&
		'0' <= s[len(s)-1] && s[len(s)-1] <= '9' && json.Valid([]byte(s))
}
