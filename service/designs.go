package service

import (
	"context"
	"net/http"
	"strings"

	"soffit.example/beam"
	"soffit.example/service/internal/strict"
	"soffit.example/service/internal/wire"
	"soffit.example/units"
)

// designs answers POST /v1/designs.
func (s *Service) designs(w http.ResponseWriter, r *http.Request) error {
	faults := &strict.Faults{Most: s.limits.Faults}
	request, err := read(s, w, r, s.briefs, faults)
	if err != nil {
		return err
	}
	code := s.code(request.Code, faults, "/code")
	in := intakeFor(code, faults)
	brief := in.brief(&request, "")
	design := func(ctx context.Context) (*beam.Result, error) { return beam.Design(ctx, code, brief) }
	validate := func(code beam.Code) error { return beam.Validate(code, brief) }
	result, err := s.judge(r.Context(), code, validate, faults, "", design)
	if err != nil {
		return err
	}
	return s.replyDesign(w, result, &request, request)
}

// checkLayout answers POST /v1/checks.
func (s *Service) checkLayout(w http.ResponseWriter, r *http.Request) error {
	faults := &strict.Faults{Most: s.limits.Faults}
	request, err := read(s, w, r, s.checks, faults)
	if err != nil {
		return err
	}
	code := s.code(request.Brief.Code, faults, "/brief/code")
	in := intakeFor(code, faults)
	brief := in.brief(&request.Brief, "/brief")
	layout := in.layout(&request.Layout, &brief, "/layout")
	check := func(ctx context.Context) (*beam.Result, error) { return beam.CheckLayout(ctx, code, brief, layout) }
	validate := func(code beam.Code) error { return beam.ValidateLayout(code, brief, layout) }
	result, err := s.judge(r.Context(), code, validate, faults, "/brief", check)
	if err != nil {
		return err
	}
	return s.replyDesign(w, result, &request.Brief, request)
}

// judge runs do, unless the request has faults. Then it has package beam add
// those that it sees, so that one reply lists all.
func (s *Service) judge(ctx context.Context, code beam.Code, validate func(beam.Code) error, faults *strict.Faults, at string, do func(context.Context) (*beam.Result, error)) (*beam.Result, error) {
	if !faults.None() {
		if code != nil {
			addInput(faults, validate(code), at)
		}
		return nil, invalidInput(faults.All())
	}
	var result *beam.Result
	err := s.compute(ctx, func(ctx context.Context) (err error) {
		result, err = do(ctx)
		return err
	})
	if err != nil && addInput(faults, err, at) {
		return nil, invalidInput(faults.All())
	}
	return result, err
}

// replyDesign writes a result as the request asked for it.
func (s *Service) replyDesign(w http.ResponseWriter, result *beam.Result, brief *wire.Brief, request any) error {
	sum, err := hash(request)
	if err != nil {
		return err
	}
	out := outlet{system: reportIn(brief.ReportIn, result.System), full: brief.Detail != nil}
	w.Header().Add("Vary", "Accept")
	return reply(w, http.StatusOK, out.design(result, sum))
}

// reportIn is the system of units of a reply.
func reportIn(asked *string, usual units.System) units.System {
	if asked == nil {
		return usual
	}
	system, err := units.ParseSystem(*asked)
	if err != nil {
		return usual // the word has a fault of its own
	}
	return system
}

// addInput adds the faults of an *beam.InputError, whose paths are those of a
// brief alone, at the place of the brief in the request. Paths of a layout
// stand beside it.
func addInput(faults *strict.Faults, err error, at string) bool {
	input, ok := inputError(err)
	if !ok {
		return false
	}
	for _, f := range input.Faults {
		if !strings.HasPrefix(f.Path, "/layout") {
			f.Path = at + f.Path
		}
		faults.Add(strict.Fault(f))
	}
	return true
}
