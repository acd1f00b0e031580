package aci318

import (
	"soffit.example/beam"
	"soffit.example/units"
)

// judgeWhole appends the limits of the member as such, and names what belongs
// to the job and is not judged.
func (e *edition) judgeWhole(dst []beam.Check, t *beam.Trial) []beam.Check {
	dst = e.appendDepth(dst, t)
	dst = e.appendSideFace(dst, t)
	dst = e.appendTorsionSides(dst, t)
	dst = e.appendBracing(dst, t)
	dst = e.appendJoist(dst, t)
	dst = e.appendFlange(dst, t)
	if t.Forces.Spans() == 0 {
		dst = append(dst, notJudgedDepth)
	}
	dst = appendHung(dst, &t.Brief)
	return append(dst, notJudged[:]...)
}

// bracedWidths is the greatest spacing of lateral bracing over the least width
// of the compression face (9.2.3.1).
const bracedWidths = 50

func (e *edition) appendBracing(dst []beam.Check, t *beam.Trial) []beam.Check {
	b := &t.Brief
	if b.Braced.IsZero() {
		return append(dst, beam.NotJudgedCheck("bracing.spacing", "9.2.3.1",
			"the spacing of lateral bracing of the compression face is not given; the beam is taken as braced"))
	}
	c := beam.Check{ID: "bracing.spacing", Clause: "9.2.3.1"}
	c.Compare(b.Braced.Amount(), compressionWidth(t).Scale(bracedWidths).Amount())
	return append(dst, c)
}

// compressionWidth is the least width of the faces that some moment presses on;
// of both where none does.
func compressionWidth(t *beam.Trial) units.Length {
	g := &t.Geometry
	pressed := [2]bool{bendsAnywhere(t, beam.Positive), bendsAnywhere(t, beam.Negative)}
	switch pressed {
	case [2]bool{true, false}:
		return g.TopWidth
	case [2]bool{false, true}:
		return g.BottomWidth
	}
	return g.TopWidth.Min(g.BottomWidth)
}

var notJudgedDepth = beam.NotJudgedCheck("scope.deep-beam", "9.9.1.1",
	"the demands come without a beam: whether it is deep, or loaded close to a support, is the caller's to see")

// notJudged are limit states of the standard that this version leaves open.
var notJudged = [...]beam.Check{
	beam.NotJudgedCheck("development.anchorage", "9.7.1, 25.4",
		"bars run the full length of the beam; whether they are developed at the supports and past critical sections is not judged by this version"),
	beam.NotJudgedCheck("cutoff.extension", "9.7.3",
		"no bar is cut off inside the beam; extensions into the supports (9.7.3.8) are not judged by this version"),
	beam.NotJudgedCheck("splices.lap", "25.5",
		"bars are drawn in one length; where stock is shorter they are spliced, which this version does not design"),
	beam.NotJudgedCheck("supports.bearing", "22.8",
		"bearing on the supports, and the supports themselves, are not judged by this version"),
	beam.NotJudgedCheck("integrity.continuity", "9.7.7",
		"whether the beam is one of a perimeter, and how its bars go on into its neighbours, is not part of the input"),
	beam.NotJudgedCheck("seismic.detailing", "Chapter 18",
		"the seismic-force-resisting system and the design category are not part of the input"),
	beam.NotJudgedCheck("durability.exposure", "19.3",
		"the exposure categories F, S, W and C are not part of the input; only cover is judged"),
	beam.NotJudgedCheck("fire.cover", "4.11",
		"the fire rating is not part of the input; it may call for more cover"),
}
