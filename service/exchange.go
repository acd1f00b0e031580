package service

import (
	"bytes"
	"context"
	"crypto/sha256"
	"encoding/hex"
	"errors"
	"fmt"
	"io"
	"mime"
	"net/http"
	"os"
	"strconv"
	"strings"

	json2 "github.com/go-json-experiment/json"
	"github.com/go-json-experiment/json/jsontext"

	"soffit.example/service/internal/strict"
	"soffit.example/units"
)

// read reads the body of a request and decodes it. Structural faults are
// added to faults; the value holds what was in order.
func read[T any](s *Service, w http.ResponseWriter, r *http.Request, reader *strict.Reader[T], faults *strict.Faults) (T, error) {
	var none T
	if err := jsonOnly(r); err != nil {
		return none, err
	}
	body, err := io.ReadAll(http.MaxBytesReader(w, r.Body, s.limits.Body))
	if err != nil {
		return none, bodyError(err)
	}
	return reader.Read(body, faults)
}

// bodyError turns every failure to read a body into the sender's, save those
// that problemOf knows better.
func bodyError(err error) error {
	var large *http.MaxBytesError
	if errors.As(err, &large) || errors.Is(err, os.ErrDeadlineExceeded) || errors.Is(err, context.Canceled) {
		return err
	}
	return &strict.SyntaxError{Reason: "the body does not arrive as its headers announce it"}
}

// jsonOnly checks what the headers say of the body and of the reply.
func jsonOnly(r *http.Request) error {
	if !accepts(r.Header.Values("Accept"), "application", "json") {
		return &problem{kind: notAcceptable, detail: fmt.Sprintf("%q does not accept application/json", clip(strings.Join(r.Header.Values("Accept"), ", ")))}
	}
	given := r.Header.Get("Content-Type")
	media, params, err := mime.ParseMediaType(given)
	switch {
	case err != nil || media != "application/json":
		return &problem{kind: mediaType, detail: fmt.Sprintf("Content-Type is %q; it must be application/json", clip(given))}
	case params["charset"] != "" && !strings.EqualFold(params["charset"], "utf-8"):
		return &problem{kind: mediaType, detail: fmt.Sprintf("the charset is %q; it must be utf-8", clip(params["charset"]))}
	}
	if coding := r.Header.Get("Content-Encoding"); coding != "" && !strings.EqualFold(coding, "identity") {
		return &problem{kind: mediaType, detail: fmt.Sprintf("Content-Encoding is %q; bodies are read without", clip(coding))}
	}
	return nil
}

// accepts reports whether an Accept header admits a media type (RFC 9110,
// 12.5.1): the most specific range that matches decides, and q=0 excludes.
func accepts(header []string, typ, subtype string) bool {
	all := strings.Join(header, ",")
	if strings.TrimSpace(all) == "" {
		return true
	}
	best, admitted := 0, false
	for part := range strings.SplitSeq(all, ",") {
		media, params, err := mime.ParseMediaType(part)
		if err != nil {
			continue
		}
		specific := 0
		switch media {
		case typ + "/" + subtype:
			specific = 3
		case typ + "/*":
			specific = 2
		case "*/*":
			specific = 1
		}
		if specific > best {
			q, err := strconv.ParseFloat(params["q"], 64)
			best, admitted = specific, params["q"] == "" || err == nil && q > 0
		}
	}
	return admitted
}

// clip shortens what a problem repeats of a header.
func clip(s string) string {
	const longest = 60
	if len(s) > longest {
		return strings.ToValidUTF8(s[:longest], "") + "…"
	}
	return s
}

// replyForm is how replies are written: plain numbers like quantities, at 12
// significant digits.
var replyForm = json2.JoinOptions(
	json2.Deterministic(true),
	json2.WithMarshalers(json2.MarshalToFunc(func(e *jsontext.Encoder, v float64) error {
		m, err := units.SI.Express(units.Plain(v)).MarshalJSON()
		if err != nil {
			return err
		}
		return e.WriteValue(m)
	})),
)

func encode(v any) ([]byte, error) {
	var b bytes.Buffer
	if err := json2.MarshalWrite(&b, v, replyForm); err != nil {
		return nil, fmt.Errorf("service: encoding a reply: %w", err)
	}
	b.WriteByte('\n')
	return b.Bytes(), nil
}

// reply answers with a value that must not be kept.
func reply(w http.ResponseWriter, status int, v any) error {
	data, err := encode(v)
	if err != nil {
		return err
	}
	w.Header().Set("Content-Type", "application/json")
	w.Header().Set("Cache-Control", "no-store")
	write(w, status, data)
	return nil
}

// write sends a complete body. There is nobody left to tell if it fails.
func write(w http.ResponseWriter, status int, data []byte) {
	w.Header().Set("Content-Length", strconv.Itoa(len(data)))
	w.WriteHeader(status)
	_, _ = w.Write(data)
}

// hash identifies a request as read: members in the order of their type,
// quantities in SI units. How the request was written does not matter.
func hash(request any) (string, error) {
	h := sha256.New()
	if err := json2.MarshalWrite(h, request, json2.Deterministic(true)); err != nil {
		return "", fmt.Errorf("service: hashing a request: %w", err)
	}
	return "sha256:" + hex.EncodeToString(h.Sum(nil)), nil
}
