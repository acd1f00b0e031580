package service

import (
	"context"
	"errors"
	"fmt"
	"net/http"

	"soffit.example/bars"
	"soffit.example/beam"
	"soffit.example/service/internal/strict"
	"soffit.example/service/internal/wire"
	"soffit.example/units"
)

// Physical bounds of a form, as package beam has them for a brief.
var (
	leastSide    = units.Millimetre.Of(50)
	greatestSide = units.Metre.Of(10)
)

// fits answers POST /v1/fits.
func (s *Service) fits(w http.ResponseWriter, r *http.Request) error {
	faults := &strict.Faults{Most: s.limits.Faults}
	request, err := read(s, w, r, s.fittings, faults)
	if err != nil {
		return err
	}
	code := s.code(request.Code, faults, "/code")
	in := intakeFor(code, faults)
	cage, catalog, layers := in.fit(&request)
	if !faults.None() {
		return invalidInput(faults.All())
	}
	problem := &beam.Problem{Code: code, System: code.Edition().System, Catalog: catalog}
	problem.Brief.Section = beam.Section{Shape: beam.Rectangular, Width: request.Width, Depth: request.Depth}
	problem.Brief.Concrete.Aggregate = value(request.Aggregate)
	problem.Brief.Reinforcement.Catalog = catalog.ID()

	out := outlet{system: reportIn(request.ReportIn, code.Edition().System)}
	answer := wire.Fits{Engine: thisEngine(), Code: request.Code, ReportIn: out.system}
	err = s.compute(r.Context(), func(context.Context) error {
		return out.fit(&answer, cage, layers, code.Gaps(problem))
	})
	if err != nil {
		return fitError(err)
	}
	if request.Aggregate == nil {
		answer.Notes = append(answer.Notes, "aggregate is not given: the clear distance that depends on it is not required here")
	}
	if answer.InputHash, err = hash(request); err != nil {
		return err
	}
	return reply(w, http.StatusOK, answer)
}

// fit converts what a fit is about.
func (in *intake) fit(w *wire.FitsRequest) (*bars.Cage, bars.Catalog, []bars.Layer) {
	for _, side := range []struct {
		path string
		v    units.Length
	}{{"/width", w.Width}, {"/depth", w.Depth}} {
		if !leastSide.AtMost(side.v) || !side.v.AtMost(greatestSide) {
			in.fault(side.path, "50 mm to 10 m", "is %s; it must be from 50 mm to 10 m", in.system.Format(side.v.Amount()))
		}
	}
	above(in, "/aggregate", w.Aggregate)
	if c := w.Cover.Amount().SI(); !(c >= 0) || !w.Cover.Scale(2).Less(w.Width.Min(w.Depth)) {
		in.fault("/cover", "zero, to less than half the smaller side", "is %s; it must be from zero to less than half the smaller side", in.system.Format(w.Cover.Amount()))
	}
	cage := &bars.Cage{Width: w.Width, Depth: w.Depth, SideCover: w.Cover, FaceCover: w.Cover}
	if value(w.Corner) == "tucked" {
		cage.Corner = bars.Tucked
	}
	catalog, ok := in.catalogID(w.Stirrup.Catalog, "/stirrup/catalog")
	if !ok {
		return cage, catalog, nil
	}
	cage.Stirrup = in.size(catalog, w.Stirrup.Size, "/stirrup/size")
	if !cage.Stirrup.IsZero() {
		if _, err := cage.Stirrup.Bend(bars.Stirrup); err != nil {
			in.fault("/stirrup/size", "", "is %q, for which the catalog has no rule of bending stirrups", cage.Stirrup.Name)
		}
	}
	var layers []bars.Layer
	for i, l := range w.Layers {
		size := in.size(catalog, l.Size, fmt.Sprintf("/layers/%d/size", i))
		layers = append(layers, bars.Layer{in.bundles(size, l.Count, l.Bundled, fmt.Sprintf("/layers/%d/bundled", i))})
	}
	return cage, catalog, layers
}

// bundles groups bars of a size, single ones unless bundled says otherwise.
func (in *intake) bundles(size bars.Size, count int, bundled *int, path string) bars.Group {
	if bundled == nil || size.IsZero() {
		return bars.Group{Size: size, Count: count}
	}
	n := *bundled
	unit, err := bars.Bundle(size, n)
	if err != nil || count%n != 0 {
		in.fault(path, "a divisor of count", "is %d, and %d bars do not make up bundles of it", n, count)
		return bars.Group{Size: size, Count: count}
	}
	return bars.Group{Size: unit, Count: count / n}
}

// catalogID finds a bar catalog.
func (in *intake) catalogID(id, path string) (bars.Catalog, bool) {
	c, err := bars.Lookup(id)
	if err != nil {
		in.faults.Add(unknownName(path, "catalog", id, catalogIDs()))
	}
	return c, err == nil
}

// size finds a size of a catalog.
func (in *intake) size(c bars.Catalog, name, path string) bars.Size {
	size, err := c.Size(name)
	if err != nil {
		fault := unknownName(path, "size", name, sizeNames(c))
		var unknown *bars.UnknownError
		if errors.As(err, &unknown) { // the catalog knows which number is nearest
			fault.Detail = fmt.Sprintf("size is %q, which is not in %s; did you mean %q?", name, c.ID(), unknown.Nearest)
		}
		in.faults.Add(fault)
	}
	return size
}

func sizeNames(c bars.Catalog) []string {
	var names []string
	for _, s := range c.Sizes() {
		names = append(names, s.Name)
	}
	return names
}

// fitError tells a fit that makes no sense from a fault of the service.
func fitError(err error) error {
	var e *bars.RangeError
	if errors.As(err, &e) {
		return invalidInput([]strict.Fault{{Detail: fmt.Sprintf("%s is %s", e.Field, e.Value), Allowed: e.Allowed}})
	}
	return err
}

// fit lays the bars and reads everything off their coordinates.
func (o *outlet) fit(w *wire.Fits, cage *bars.Cage, layers []bars.Layer, need bars.Clearances) error {
	f, err := cage.Fit(layers, need)
	if err != nil {
		return err
	}
	w.Verdict = beam.Pass.String()
	w.Failed, w.Notes = []string{}, []string{}
	fail := func(format string, args ...any) {
		w.Verdict = beam.Fail.String()
		w.Failed = append(w.Failed, fmt.Sprintf(format, args...))
	}
	singles := f.AppendSingles(nil)
	w.Bars = make([]wire.FitBar, len(singles))
	for i, b := range singles {
		w.Bars[i] = wire.FitBar{Size: b.Size.Name, X: express(o, b.X), Y: express(o, b.Y), Layer: b.Layer}
	}
	gap := func(g bars.Gap, where string) (clear, required *units.Measure) {
		if !g.Exists() {
			return nil, nil
		}
		c, r := express(o, g.Clear), express(o, g.Required)
		if !g.OK() {
			fail("clear distance %s: %s is less than %s", where, c, r)
		}
		return &c, &r
	}
	w.ClearSpacing.Horizontal, w.ClearSpacing.Required.Horizontal = gap(f.Horizontal(), "in a layer")
	w.ClearSpacing.Vertical, w.ClearSpacing.Required.Vertical = gap(f.Vertical(), "between layers")
	w.LeastWidth, w.Centroid, w.Area = express(o, f.LeastWidth), express(o, f.Centroid), express(o, f.Area)
	if w.Inside = f.Inside(); !w.Inside {
		fail("not every bar lies inside the stirrup")
	}
	if w.Aligned = f.Aligned(); !w.Aligned {
		w.Notes = append(w.Notes, "upper bars do not stand directly above lower ones")
	}
	size := layers[0][0].Size
	for _, at := range []struct {
		corner bars.Corner
		most   *int
	}{{bars.Seated, &w.Most.Seated}, {bars.Tucked, &w.Most.Tucked}} {
		c := *cage
		c.Corner = at.corner
		if *at.most, err = c.MostInLayer(size, need.InLayer); err != nil {
			return err
		}
		*at.most *= size.Bundled()
	}
	if most := max(w.Most.Seated, w.Most.Tucked); most == bars.MaxBars*size.Bundled() {
		w.Notes = append(w.Notes, fmt.Sprintf("more than %d bars would fit; counting stops there", most))
	}
	return nil
}

// inputError finds the input error in an error.
func inputError(err error) (*beam.InputError, bool) {
	var input *beam.InputError
	ok := errors.As(err, &input)
	return input, ok
}
