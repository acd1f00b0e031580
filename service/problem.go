package service

import (
	"context"
	"errors"
	"fmt"
	"log/slog"
	"net/http"
	"os"
	"strings"

	"github.com/labstack/echo/v4"

	"soffit.example/beam"
	"soffit.example/service/internal/strict"
	"soffit.example/service/internal/wire"
)

// kind is a kind of problem. Its type is "/problems/" and the name, which
// leads to its description on the page for people.
type kind struct {
	name   string
	status int
	title  string
	about  string // for the page
}

var (
	malformed     = &kind{"malformed", http.StatusBadRequest, "The request is not a JSON document", "The body is not one complete JSON value, repeats a member, is not UTF-8, or is nested too deep or too large to be a request. The detail says where reading stopped."}
	invalid       = &kind{"invalid", http.StatusUnprocessableEntity, "The request has values that cannot be used", "The body is JSON, and something in it is unknown, missing, without its unit, of the wrong dimension, out of range or contradictory. errors lists every such place with its pointer, what is wrong and what would be accepted."}
	tooLarge      = &kind{"too-large", http.StatusRequestEntityTooLarge, "The request is too large", "The body is longer than this service reads."}
	mediaType     = &kind{"media-type", http.StatusUnsupportedMediaType, "The request is not sent as JSON", "Requests are sent with Content-Type: application/json in UTF-8, and without Content-Encoding."}
	notAcceptable = &kind{"not-acceptable", http.StatusNotAcceptable, "No acceptable form of reply", "Accept names no form that this door can give. This version gives application/json."}
	slowRequest   = &kind{"slow-request", http.StatusRequestTimeout, "The request took too long to arrive", "The body did not arrive within the time that the service waits for one."}
	notFound      = &kind{"not-found", http.StatusNotFound, "There is nothing here", "The path leads to no door. The doors are listed on this page."}
	wrongMethod   = &kind{"method", http.StatusMethodNotAllowed, "The method is not one of this door", "The path leads to a door that takes another method; the Allow header names those it takes."}
	tooMany       = &kind{"too-many", http.StatusTooManyRequests, "Too many requests at once", "This client has as many requests in hand as it may. Try again after the time in Retry-After."}
	busy          = &kind{"busy", http.StatusServiceUnavailable, "The service is busy", "All places for computation are taken. Try again after the time in Retry-After; a request may be repeated safely."}
	timeLimit     = &kind{"time-limit", http.StatusServiceUnavailable, "The computation took too long", "The request was given up at the time limit. Try again after the time in Retry-After, or ask for less: fewer sizes, depths or loads."}
	wrongHost     = &kind{"host", http.StatusMisdirectedRequest, "The request is addressed to another host", "The Host header is none of the names that this service answers to. The operator lists them with --allow-host."}
	crossOrigin   = &kind{"cross-origin", http.StatusForbidden, "The request comes from a web page elsewhere", "A browser sent this request for a page of another origin."}
	internal      = &kind{"internal", http.StatusInternalServerError, "The service failed", "A fault of the service, not of the request. The X-Request-Id header finds it in the log."}
)

func kinds() []*kind {
	return []*kind{malformed, invalid, tooLarge, mediaType, notAcceptable, slowRequest, notFound, wrongMethod,
		tooMany, busy, timeLimit, wrongHost, crossOrigin, internal}
}

// problem is an error that knows its reply.
type problem struct {
	kind   *kind
	detail string
	faults []strict.Fault
}

func (p *problem) Error() string { return p.kind.title + ": " + p.detail }

// statusClientGone is for the log: the client did not wait for a reply.
const statusClientGone = 499

// problemOf says what to answer to an error. It is the only place that
// decides; errors it does not know are faults of the service.
func problemOf(err error) *problem {
	var (
		p         *problem
		syntax    *strict.SyntaxError
		input     *beam.InputError
		large     *http.MaxBytesError
		routing   *echo.HTTPError
		asProblem = func(k *kind, format string, args ...any) *problem {
			return &problem{kind: k, detail: fmt.Sprintf(format, args...)}
		}
	)
	switch {
	case errors.As(err, &p):
		return p
	case errors.As(err, &syntax):
		return &problem{
			kind:   malformed,
			detail: fmt.Sprintf("%s, at byte %d", syntax.Reason, syntax.Offset),
			faults: []strict.Fault{{Path: syntax.Path, Detail: syntax.Reason}},
		}
	case errors.As(err, &input):
		faults := make([]strict.Fault, len(input.Faults))
		for i, f := range input.Faults {
			faults[i] = strict.Fault(f)
		}
		return invalidInput(faults)
	case errors.As(err, &large):
		return asProblem(tooLarge, "the body is larger than %d bytes", large.Limit)
	case errors.Is(err, os.ErrDeadlineExceeded):
		return asProblem(slowRequest, "the body did not arrive in time")
	case errors.Is(err, context.DeadlineExceeded):
		return asProblem(timeLimit, "the computation was given up at the time limit")
	case errors.As(err, &routing) && routing.Code == http.StatusNotFound:
		return asProblem(notFound, "the path leads to no door")
	case errors.As(err, &routing) && routing.Code == http.StatusMethodNotAllowed:
		return asProblem(wrongMethod, "the door does not take this method")
	}
	return asProblem(internal, "the service could not answer; the fault is logged")
}

func invalidInput(faults []strict.Fault) *problem {
	detail := faults[0].Detail
	if n := len(faults); n > 1 {
		detail = fmt.Sprintf("%d faults; the first: %s", n, detail)
	}
	return &problem{kind: invalid, detail: detail, faults: faults}
}

// fail answers with the problem of an error.
func (s *Service) fail(w http.ResponseWriter, r *http.Request, err error) {
	if errors.Is(err, context.Canceled) && r.Context().Err() != nil {
		noteStatus(w, statusClientGone)
		return
	}
	p := problemOf(err)
	if p.kind == internal {
		s.log.LogAttrs(r.Context(), slog.LevelError, "request failed", slog.String("request", requestID(w)), slog.Any("error", err))
	}
	body := wire.Problem{
		Type: "/problems/" + p.kind.name, Title: p.kind.title, Status: p.kind.status,
		Detail: p.detail, Instance: instance(r), Errors: p.faults,
	}
	data, err := encode(body)
	if err != nil { // texts only: cannot happen
		data = []byte(`{"title":"The service failed","status":500}`)
	}
	h := w.Header()
	h.Set("Content-Type", "application/problem+json")
	h.Set("Cache-Control", "no-store")
	if p.kind == busy || p.kind == tooMany || p.kind == timeLimit {
		h.Set("Retry-After", "1")
	}
	write(w, p.kind.status, data)
}

// instance is the path asked for, as far as it can be repeated safely.
func instance(r *http.Request) string {
	const longest = 200
	path := r.URL.EscapedPath()
	if len(path) > longest {
		path = path[:longest]
	}
	return path
}

// unknownName is the fault of a name that is none of those known.
func unknownName(path, what, given string, known []string) strict.Fault {
	list := strings.Join(known, ", ")
	detail := fmt.Sprintf("%s is %q; it must be one of %s", what, given, list)
	if near := strict.Nearest(given, known); near != "" {
		detail += fmt.Sprintf("; did you mean %q?", near)
	}
	return strict.Fault{Path: path, Detail: detail, Allowed: list}
}
