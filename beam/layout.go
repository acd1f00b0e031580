package beam

import "soffit.example/units"

// Layout is a set of bars and stirrups, as a drawing would carry it. It is
// plain data: what Design returns can be kept, edited and given to CheckLayout.
type Layout struct {
	Longitudinal []Row
	Transverse   []Zone
}

// Row is a group of like bars in one layer of one face.
type Row struct {
	Mark  string
	Bar   string // size name in the brief's catalog
	Count int    // of side bars: on each side face
	Face  Face
	Layer int // 1 is nearest the face; of side bars zero
	// Spacing is the vertical distance between side bars, counted up from the
	// highest layer at the bottom with more than one bar; zero for other faces.
	Spacing units.Length
	// InCompression says that the bars are relied on as compression steel, so
	// that the code's tie rules apply to them; bars that only hold stirrups
	// are not. It goes for the whole face: one row that says so is enough.
	InCompression bool
	From, To      units.Length // along the whole beam; both zero: full length
	Start, End    string       // how each end stops; "straight" in this version
}

// Zone is a run of like stirrups. The first stands half a spacing inside the
// zone.
type Zone struct {
	Mark     string
	Span     int // 1-based; zero with demands given directly
	Bar      string
	Legs     int
	Spacing  units.Length
	Count    int          // zero with demands given directly
	From, To units.Length // along the span, from its left support's centre
	Form     string       // "closed" or "open"
}
