package beam

import "soffit.example/units"

// Layout is a set of bars and stirrups, as a drawing would carry it. It is
// plain data: what Design returns can be kept, edited and given to CheckLayout.
type Layout struct {
	Longitudinal []Row
	Transverse   []Zone
	Bent         []BentBars
}

// Row is a group of like bars in one layer of one face.
type Row struct {
	Mark  string
	Bar   string // size name in the brief's catalog
	Count int    // of side bars: on each side face
	Face  Face
	Layer int // 1 is nearest the face; of side bars zero
	// Flange says that the bars lie in the flange beside the web, at the level
	// of the first layer, half of Count on each side (an odd one more on the
	// left), of an ell all on its one side. They stand at Spacing outward from
	// the outermost bar of the web, or from the bars of the flange row listed
	// before.
	Flange bool
	// Spacing is the vertical distance between side bars, counted up from the
	// highest layer at the bottom with more than one bar, or the distance
	// across of bars in a flange; zero for other rows.
	Spacing units.Length
	Bundled int          // bars in contact in each bundle, which divides Count; zero or one: single bars
	Yield   units.Stress // of these bars; zero: as the brief
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
	// Angle is that of the legs with the axis of the beam, in degrees, leaning
	// against the shear; zero: 90.
	Angle float64
}

// Open reports whether the stirrups are open; they are closed unless the layout
// says otherwise.
func (z *Zone) Open() bool { return z.Form == "open" }

// BentBars are longitudinal bars bent up, or down, across the web to carry
// shear there: Bends groups, one Spacing apart, of Count bars each. They count
// for shear alone.
type BentBars struct {
	Mark    string
	Bar     string
	Count   int // in each group
	Span    int
	At      units.Length // where the first group's slope crosses mid-depth, from the span's left support
	Angle   float64      // with the axis of the beam, in degrees
	Rises   string       // towards which end of the span: "left" or "right"
	Bends   int          // groups; zero: 1
	Spacing units.Length // between groups; zero with one
}
