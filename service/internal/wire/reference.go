package wire

import "soffit.example/units"

// Fits is the reply about bars in a stirrup.
type Fits struct {
	Engine       Engine        `json:"engine" doc:"What computed the reply."`
	Code         string        `json:"code" doc:"Id of the design code."`
	ReportIn     units.System  `json:"report_in" doc:"Units of the reply."`
	InputHash    string        `json:"input_hash" doc:"SHA-256 of the request as read: the same for every way of writing the same request."`
	Verdict      string        `json:"verdict" enum:"pass fail" doc:"Whether every clear distance is kept and every bar lies inside the stirrup."`
	Bars         []FitBar      `json:"bars" doc:"Every bar, by layer and from left to right."`
	ClearSpacing ClearSpacing  `json:"clear_spacing" doc:"The tightest clear distances."`
	LeastWidth   units.Measure `json:"least_width" doc:"Least width of the form for this arrangement."`
	Most         MostInLayer   `json:"most_in_a_layer" doc:"Most bars of the first layer's size in one layer, by where the corner bars lie."`
	Centroid     units.Measure `json:"centroid" doc:"From the face to the centroid of all bars."`
	Area         units.Measure `json:"area" doc:"Area of all bars."`
	Inside       bool          `json:"inside" doc:"Whether every bar lies inside the stirrup."`
	Aligned      bool          `json:"aligned" doc:"Whether upper bars stand directly above lower ones."`
	Failed       []string      `json:"failed" doc:"What does not fit, in words."`
	Notes        []string      `json:"notes" doc:"What was decided on the way."`
}

// FitBar is a bar where it lies.
type FitBar struct {
	Size  string        `json:"size" doc:"Size, as the catalog names it."`
	X     units.Measure `json:"x" doc:"From the left face to the centre."`
	Y     units.Measure `json:"y" doc:"From the face at which the bars lie to the centre."`
	Layer int           `json:"layer" doc:"Layer, 1 nearest the face."`
}

// ClearSpacing holds the tightest clear distances, with those required.
type ClearSpacing struct {
	Horizontal *units.Measure `json:"horizontal,omitzero" doc:"Between neighbours of a layer. Absent with one bar."`
	Vertical   *units.Measure `json:"vertical,omitzero" doc:"Between layers. Absent with one layer."`
	Required   Required       `json:"required" doc:"What the code requires there."`
}

// Required are required clear distances.
type Required struct {
	Horizontal *units.Measure `json:"horizontal,omitzero" doc:"Between neighbours of a layer."`
	Vertical   *units.Measure `json:"vertical,omitzero" doc:"Between layers."`
}

// MostInLayer is the most bars in a layer.
type MostInLayer struct {
	Seated int `json:"seated" doc:"Corner bars on the stirrup's leg at the bend's tangent point."`
	Tucked int `json:"tucked" doc:"Corner bars pushed into the bend."`
}

// Catalogs lists the bar catalogs.
type Catalogs struct {
	Catalogs []CatalogLine `json:"catalogs" doc:"Every catalog."`
}

// CatalogLine is one bar catalog in a list.
type CatalogLine struct {
	ID    string   `json:"id" doc:"Id of the catalog."`
	Title string   `json:"title" doc:"The catalog in a line."`
	Sizes []string `json:"sizes" doc:"Names of its sizes, from the smallest."`
}

// Catalog is one bar catalog.
type Catalog struct {
	ID         string   `json:"id" doc:"Id of the catalog."`
	Title      string   `json:"title" doc:"The catalog in a line."`
	Sources    []string `json:"sources" doc:"Standards whose values it holds."`
	Provenance string   `json:"provenance" doc:"How the values came into the catalog."`
	Sizes      []Size   `json:"sizes" doc:"Sizes, from the smallest."`
	Grades     []Grade  `json:"grades" doc:"Strength grades."`
}

// Size is a bar size, with the values that its standard prints.
type Size struct {
	Name     string         `json:"name" doc:"Name of the size."`
	Diameter units.Measure  `json:"diameter" doc:"Nominal diameter."`
	Area     units.Measure  `json:"area" doc:"Nominal area."`
	Mass     units.Measure  `json:"mass" doc:"Nominal mass a length."`
	Overall  *units.Measure `json:"overall,omitzero" doc:"Diameter over the ribs, approximate. Absent where not known."`
	Bends    []BendOf       `json:"bends" doc:"Tightest standard bends, by use."`
}

// BendOf is the standard bend of a size in a use.
type BendOf struct {
	Use    string        `json:"use" enum:"main stirrup" doc:"Use of the bar."`
	Inside units.Measure `json:"inside_diameter" doc:"Inside diameter of the bend."`
	Source string        `json:"source" doc:"Standard and clause."`
}

// Grade is a strength grade.
type Grade struct {
	Name   string        `json:"name" doc:"Name of the grade."`
	Yield  units.Measure `json:"yield" doc:"Specified yield strength."`
	From   string        `json:"from" doc:"Smallest size offered."`
	To     string        `json:"to" doc:"Largest size offered."`
	Source string        `json:"source" doc:"Standard, and whether it was entered from memory."`
}

// Codes lists the design codes.
type Codes struct {
	Codes []Code `json:"codes" doc:"Every design code, in the order of preference."`
}

// Code is one edition of a design code.
type Code struct {
	ID       string       `json:"id" doc:"Id of the code."`
	Title    string       `json:"title" doc:"Title of the standard."`
	Year     int          `json:"year" doc:"Year of the edition."`
	ReportIn units.System `json:"report_in" doc:"Units that replies are in by default."`
	Scope    []string     `json:"scope" doc:"What is refused, in words."`
	Cautions []string     `json:"cautions" doc:"Standing cautions."`
}

// Units lists the units that are read and printed.
type Units struct {
	Dimensions []Dimension `json:"dimensions" doc:"Every kind of quantity."`
}

// Dimension is a kind of quantity.
type Dimension struct {
	Name   string `json:"name" doc:"Name of the kind of quantity."`
	Prints Prints `json:"prints" doc:"Symbols of the units that replies are in."`
	Units  []Unit `json:"units" doc:"Units read, the SI unit first."`
}

// Prints are the units printed by report_in.
type Prints struct {
	SI string `json:"si" doc:"With report_in si."`
	US string `json:"us" doc:"With report_in us."`
}

// Unit is a unit that is read.
type Unit struct {
	Symbol  string   `json:"symbol" doc:"Symbol; case matters."`
	Name    string   `json:"name" doc:"Name."`
	Aliases []string `json:"aliases" doc:"Further symbols that are read, never printed."`
	Factor  string   `json:"factor" doc:"Size in the SI unit, exactly: a decimal, or a quotient of two."`
	UCUM    string   `json:"ucum" doc:"Code in the Unified Code for Units of Measure."`
}
