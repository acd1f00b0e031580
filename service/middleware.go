package service

import (
	"crypto/rand"
	"encoding/hex"
	"fmt"
	"log/slog"
	"net"
	"net/http"
	"runtime/debug"
	"slices"
	"strings"
	"time"
)

// guard puts what every request passes round the router, the outermost last.
func (s *Service) guard(router http.Handler, hosts []string) http.Handler {
	if len(hosts) == 0 {
		hosts = []string{"localhost", "127.0.0.1", "::1"}
	}
	h := s.sameOrigin(router)
	h = s.knownHost(h, hosts)
	h = s.recovered(h)
	h = securityHeaders(h)
	return s.logged(h)
}

// recorder remembers the status of a reply.
type recorder struct {
	http.ResponseWriter
	status int
}

func (r *recorder) WriteHeader(status int) {
	if r.status == 0 || r.status < 200 { // an informational status is not the last
		r.status = status
	}
	r.ResponseWriter.WriteHeader(status)
}

func (r *recorder) Write(p []byte) (int, error) {
	if r.status == 0 {
		r.status = http.StatusOK
	}
	return r.ResponseWriter.Write(p)
}

// Unwrap lets http.ResponseController reach the connection.
func (r *recorder) Unwrap() http.ResponseWriter { return r.ResponseWriter }

// noteStatus records a status for the log where no reply is sent.
func noteStatus(w http.ResponseWriter, status int) {
	for {
		switch t := w.(type) {
		case *recorder:
			if t.status == 0 {
				t.status = status
			}
			return
		case interface{ Unwrap() http.ResponseWriter }:
			w = t.Unwrap()
		default:
			return
		}
	}
}

const requestIDHeader = "X-Request-Id"

func requestID(w http.ResponseWriter) string { return w.Header().Get(requestIDHeader) }

// logged gives each request its id and writes a line about it. The query is
// not logged: it may carry what is nobody's business.
func (s *Service) logged(next http.Handler) http.Handler {
	return http.HandlerFunc(func(w http.ResponseWriter, r *http.Request) {
		start := time.Now()
		id := r.Header.Get(requestIDHeader)
		if !wellFormedID(id) {
			id = newID()
		}
		w.Header().Set(requestIDHeader, id)
		rec := &recorder{ResponseWriter: w}
		next.ServeHTTP(rec, r)
		level := slog.LevelInfo
		if rec.status >= 500 && rec.status != http.StatusServiceUnavailable {
			level = slog.LevelError
		}
		s.log.LogAttrs(r.Context(), level, "request",
			slog.String("request", id), slog.String("method", r.Method), slog.String("path", r.URL.Path),
			slog.Int("status", rec.status), slog.Duration("took", time.Since(start)), slog.String("client", r.RemoteAddr))
	})
}

// wellFormedID says which ids of clients are taken over: others would let a
// client write what it likes into the log and the reply.
func wellFormedID(id string) bool {
	if id == "" || len(id) > 64 {
		return false
	}
	return strings.IndexFunc(id, func(r rune) bool {
		return !(r >= 'a' && r <= 'z' || r >= 'A' && r <= 'Z' || r >= '0' && r <= '9' || strings.ContainsRune("._-", r))
	}) < 0
}

func newID() string {
	var b [12]byte
	_, _ = rand.Read(b[:]) // never fails
	return hex.EncodeToString(b[:])
}

// recovered turns a panic into a problem that says nothing of the inside.
func (s *Service) recovered(next http.Handler) http.Handler {
	return http.HandlerFunc(func(w http.ResponseWriter, r *http.Request) {
		defer func() {
			p := recover()
			if p == nil {
				return
			}
			if p == http.ErrAbortHandler { // net/http's own way to cut a reply short
				panic(p)
			}
			s.log.LogAttrs(r.Context(), slog.LevelError, "panic", slog.String("request", requestID(w)),
				slog.Any("panic", p), slog.String("stack", string(debug.Stack())))
			if rec, ok := w.(*recorder); ok && rec.status != 0 {
				panic(http.ErrAbortHandler) // the reply has begun: cut it, so that it is not taken for whole
			}
			s.fail(w, r, fmt.Errorf("service: panic: %v", p))
		}()
		next.ServeHTTP(w, r)
	})
}

// securityHeaders are harmless to programs and stop a browser from making
// more of a reply than it is.
func securityHeaders(next http.Handler) http.Handler {
	return http.HandlerFunc(func(w http.ResponseWriter, r *http.Request) {
		h := w.Header()
		h.Set("X-Content-Type-Options", "nosniff")
		h.Set("Referrer-Policy", "no-referrer")
		h.Set("Content-Security-Policy", "default-src 'none'; frame-ancestors 'none'; base-uri 'none'; form-action 'none'")
		h.Set("Cross-Origin-Resource-Policy", "same-origin")
		next.ServeHTTP(w, r)
	})
}

// knownHost turns away requests addressed to a name that is not ours: a web
// page can make its own name resolve to this machine, and then is same-origin
// with it. Probes address machines by number and learn nothing, so they pass.
func (s *Service) knownHost(next http.Handler, hosts []string) http.Handler {
	return http.HandlerFunc(func(w http.ResponseWriter, r *http.Request) {
		if r.URL.Path != "/healthz" && r.URL.Path != "/readyz" && !slices.ContainsFunc(hosts, func(h string) bool { return strings.EqualFold(h, hostOf(r.Host)) }) {
			s.fail(w, r, &problem{kind: wrongHost, detail: fmt.Sprintf("the request is addressed to %q, which is not a name of this service", clip(r.Host))})
			return
		}
		next.ServeHTTP(w, r)
	})
}

// hostOf is the host of a Host header, without port and brackets.
func hostOf(header string) string {
	if host, _, err := net.SplitHostPort(header); err == nil {
		return host
	}
	return strings.TrimSuffix(strings.TrimPrefix(header, "["), "]")
}

// sameOrigin turns away what a browser sends for a page of another origin.
func (s *Service) sameOrigin(next http.Handler) http.Handler {
	protect := http.NewCrossOriginProtection()
	return http.HandlerFunc(func(w http.ResponseWriter, r *http.Request) {
		if err := protect.Check(r); err != nil {
			s.fail(w, r, &problem{kind: crossOrigin, detail: "requests of web pages are taken from this service's own pages only"})
			return
		}
		next.ServeHTTP(w, r)
	})
}
