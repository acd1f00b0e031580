package service

import (
	"context"
	"errors"
	"fmt"
	"io"
	"log/slog"
	"net/http"
	"net/url"
	"runtime"
	"slices"
	"strings"
	"sync/atomic"
	"time"

	"github.com/labstack/echo/v4"
	"golang.org/x/sync/semaphore"

	"soffit.example/beam"
	"soffit.example/service/internal/strict"
	"soffit.example/service/internal/wire"
)

// Options say what a service offers and where its limits are.
type Options struct {
	Codes  []beam.Code // design codes offered, the preferred one first
	Limits Limits
	// Hosts are the names that requests may be addressed to, without port.
	// None: localhost, 127.0.0.1 and ::1, so that no web page can reach the
	// service by a name of its own that resolves to this machine.
	Hosts []string
	Log   *slog.Logger // nil: no log
}

// Limits bound what one request, and all of them together, may take. A zero
// field stands for its default.
type Limits struct {
	Body      int64         // bytes of a request; default 256 KiB
	Depth     int           // levels of nesting in a request; default 16
	Values    int           // names and values in a request; default 20,000
	Faults    int           // faults listed in one reply; default 100
	Time      time.Duration // for the computation of one request; default 10 s
	Work      int           // requests computed at once; default one for each processor
	Wait      time.Duration // for a place among those; default 50 ms
	PerClient int           // requests of one client address in hand at once; default: not limited
}

func (l Limits) withDefaults() Limits {
	setIfZero(&l.Body, 256<<10)
	setIfZero(&l.Depth, 16)
	setIfZero(&l.Values, 20_000)
	setIfZero(&l.Faults, 100)
	setIfZero(&l.Time, 10*time.Second)
	setIfZero(&l.Work, runtime.GOMAXPROCS(0))
	setIfZero(&l.Wait, 50*time.Millisecond)
	return l
}

func setIfZero[T comparable](v *T, def T) {
	var zero T
	if *v == zero {
		*v = def
	}
}

func (l Limits) check() error {
	if l.Body < 0 || l.Depth < 0 || l.Values < 0 || l.Faults < 0 || l.Time < 0 || l.Work < 0 || l.Wait < 0 || l.PerClient < 0 {
		return errors.New("service: a limit is negative")
	}
	return nil
}

// Service answers requests. It is an http.Handler, safe for concurrent use.
type Service struct {
	codes    []beam.Code
	limits   Limits
	log      *slog.Logger
	handler  http.Handler // router and everything round it
	work     *semaphore.Weighted
	clients  clients
	stopping atomic.Bool

	briefs    *strict.Reader[wire.Brief]
	checks    *strict.Reader[wire.CheckRequest]
	sections  *strict.Reader[wire.StrengthsRequest]
	fittings  *strict.Reader[wire.FitsRequest]
	documents map[string]*document // what does not depend on a request, by path
}

// New makes a service. It fails without a design code, and where two have
// one id.
func New(o Options) (*Service, error) {
	if len(o.Codes) == 0 {
		return nil, errors.New("service: no design code is offered")
	}
	if err := o.Limits.check(); err != nil {
		return nil, err
	}
	s := &Service{
		codes:  slices.Clone(o.Codes),
		limits: o.Limits.withDefaults(),
		log:    o.Log,
	}
	if s.log == nil {
		s.log = slog.New(slog.NewTextHandler(io.Discard, nil))
	}
	for i, c := range s.codes {
		for _, d := range s.codes[:i] {
			if c.Edition().ID == d.Edition().ID {
				return nil, fmt.Errorf("service: design code %q is offered twice", c.Edition().ID)
			}
		}
	}
	s.work = semaphore.NewWeighted(int64(s.limits.Work))
	s.clients.most = s.limits.PerClient
	bounds := strict.Limits{Depth: s.limits.Depth, Values: s.limits.Values}
	s.briefs = strict.NewReader[wire.Brief](bounds)
	s.checks = strict.NewReader[wire.CheckRequest](bounds)
	s.sections = strict.NewReader[wire.StrengthsRequest](bounds)
	s.fittings = strict.NewReader[wire.FitsRequest](bounds)

	var err error
	if s.documents, err = s.publish(); err != nil {
		return nil, err
	}
	s.handler = s.guard(s.routes(), o.Hosts)
	return s, nil
}

// ServeHTTP answers one request.
func (s *Service) ServeHTTP(w http.ResponseWriter, r *http.Request) { s.handler.ServeHTTP(w, r) }

// Stopping makes /readyz say that no more requests should be sent. Requests
// that come all the same are answered.
func (s *Service) Stopping() { s.stopping.Store(true) }

// handler is an http.Handler that may fail; the error becomes a problem
// reply.
type handler func(w http.ResponseWriter, r *http.Request) error

// routes is the only place that knows the router.
func (s *Service) routes() http.Handler {
	e := echo.New()
	e.HTTPErrorHandler = func(err error, c echo.Context) {
		if !c.Response().Committed {
			s.fail(c.Response(), c.Request(), err)
		}
	}
	add := func(path string, h handler, methods ...string) {
		e.Match(methods, path, func(c echo.Context) error {
			r := c.Request()
			for _, name := range c.ParamNames() {
				value, err := url.PathUnescape(c.Param(name))
				if err != nil {
					return echo.ErrNotFound
				}
				r.SetPathValue(name, value)
			}
			return h(c.Response(), r)
		})
	}
	get := func(path string, h handler) { add(path, h, http.MethodGet, http.MethodHead) }
	post := func(path string, h handler) { add(path, s.counted(h), http.MethodPost) }

	post("/v1/designs", s.designs)
	post("/v1/checks", s.checkLayout)
	post("/v1/strengths", s.strengths)
	post("/v1/fits", s.fits)
	get(catalogRoot+":catalog", s.catalog)
	for path, d := range s.documents {
		if !strings.HasPrefix(path, catalogRoot) {
			get(path, d.serve)
		}
	}
	get("/problems/:kind", s.problemKind)
	get("/healthz", s.health)
	get("/readyz", s.ready)
	return e
}

func (s *Service) health(w http.ResponseWriter, r *http.Request) error {
	return reply(w, http.StatusOK, wire.Health{Status: "ok"})
}

func (s *Service) ready(w http.ResponseWriter, r *http.Request) error {
	if s.stopping.Load() {
		return reply(w, http.StatusServiceUnavailable, wire.Health{Status: "stopping"})
	}
	return reply(w, http.StatusOK, wire.Health{Status: "ready"})
}

// counted keeps each client within its share.
func (s *Service) counted(h handler) handler {
	return func(w http.ResponseWriter, r *http.Request) error {
		leave, ok := s.clients.enter(r.RemoteAddr)
		if !ok {
			return &problem{kind: tooMany, detail: fmt.Sprintf("this client has %d requests in hand, which is its limit", s.limits.PerClient)}
		}
		defer leave()
		return h(w, r)
	}
}

// compute runs do within the time limit, once there is a place among the
// requests computed at once. Bodies are read before, so that a slow sender
// holds no place.
func (s *Service) compute(ctx context.Context, do func(context.Context) error) error {
	ctx, cancel := context.WithTimeout(ctx, s.limits.Time)
	defer cancel()
	if !s.work.TryAcquire(1) {
		wait, cancel := context.WithTimeout(ctx, s.limits.Wait)
		defer cancel()
		if err := s.work.Acquire(wait, 1); err != nil {
			if ctx.Err() != nil {
				return ctx.Err()
			}
			return &problem{kind: busy, detail: fmt.Sprintf("all %d places for computation are taken", s.limits.Work)}
		}
	}
	defer s.work.Release(1)
	return do(ctx)
}

// code finds a design code by its id.
func (s *Service) code(id string, faults *strict.Faults, path string) beam.Code {
	known := make([]string, len(s.codes))
	for i, c := range s.codes {
		if known[i] = c.Edition().ID; known[i] == id {
			return c
		}
	}
	faults.Add(unknownName(path, "code", id, known))
	return nil
}
