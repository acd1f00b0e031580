package aci318

import (
	"math"

	"soffit.example/beam"
	"soffit.example/units"
)

// A formula reads its quantities in the units its clause is written in and
// hands its results back as quantities. These are the two directions.

func (e *edition) stressIn(q units.Stress) float64       { return q.In(e.stress) }
func (e *edition) stressOf(v float64) units.Stress       { return e.stress.Of(v) }
func (e *edition) lengthIn(q units.Length) float64       { return q.In(e.length) }
func (e *edition) lengthOf(v float64) units.Length       { return e.length.Of(v) }
func (e *edition) areaIn(q units.Area) float64           { return q.In(e.area) }
func (e *edition) areaOf(v float64) units.Area           { return e.area.Of(v) }
func (e *edition) forceIn(q units.Force) float64         { return q.In(e.force) }
func (e *edition) forceOf(v float64) units.Force         { return e.force.Of(v) }
func (e *edition) momentIn(q units.Moment) float64       { return q.In(e.moment) }
func (e *edition) momentOf(v float64) units.Moment       { return e.moment.Of(v) }
func (e *edition) steelOf(v float64) units.AreaPerLength { return e.steel.Of(v) }

// sqrtStrength is √f'c with f'c in the edition's unit of stress; by the
// standard's convention the root is again a stress in that unit (19.2.3.1 and
// throughout).
func (e *edition) sqrtStrength(fc units.Stress) float64 { return math.Sqrt(e.stressIn(fc)) }

// measured is a value on its way into a step of the working, with the unit
// its clause is written in.
type measured struct {
	amount units.Amount
	unit   string
}

func (e *edition) asStress(v float64) measured {
	return measured{e.stressOf(v).Amount(), e.stress.String()}
}
func (e *edition) asLength(v float64) measured {
	return measured{e.lengthOf(v).Amount(), e.length.String()}
}
func (e *edition) asArea(v float64) measured { return measured{e.areaOf(v).Amount(), e.area.String()} }

// asFirst is a first moment of area.
func (e *edition) asFirst(v float64) measured {
	unit := units.SectionInch3
	if e.system == units.SI {
		unit = units.SectionMillimetre3
	}
	return measured{unit.Of(v).Amount(), unit.String()}
}
func (e *edition) asForce(v float64) measured {
	return measured{e.forceOf(v).Amount(), e.force.String()}
}
func (e *edition) asMoment(v float64) measured {
	return measured{e.momentOf(v).Amount(), e.moment.String()}
}
func (e *edition) asSteel(v float64) measured {
	return measured{e.steelOf(v).Amount(), e.steel.String()}
}
func asPlain(v float64) measured { return measured{units.Plain(v), ""} }

// working collects the steps of one check. Its expressions use only
// + - * / ^ √ min max, brackets, numbers, a space for a product, and the
// symbols of earlier steps, so that a reader or a program can put the earlier
// values in and arrive at the same result. Products and quotients are taken
// from left to right; a comma between arguments is followed by a space, one
// within a symbol is not.
type working struct{ steps []beam.Step }

// given adds an input.
func (w *working) given(symbol, meaning, clause string, v measured) {
	w.steps = append(w.steps, beam.Step{Symbol: symbol, Meaning: meaning, Clause: clause, Value: v.amount, Unit: v.unit})
}

// find adds a value computed from earlier steps.
func (w *working) find(symbol, meaning, clause, expression string, v measured) {
	w.steps = append(w.steps, beam.Step{Symbol: symbol, Meaning: meaning, Clause: clause, Expression: expression, Value: v.amount, Unit: v.unit})
}

// note says of the last step which branch was taken or which cap acted.
func (w *working) note(text string) {
	if n := len(w.steps); n > 0 && text != "" {
		w.steps[n-1].Note = text
	}
}

// has reports whether a symbol already has a value.
func (w *working) has(symbol string) bool {
	for i := range w.steps {
		if w.steps[i].Symbol == symbol {
			return true
		}
	}
	return false
}
