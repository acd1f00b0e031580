package aci318

import "soffit.example/units"

// crackRules are the coefficients of the bar spacing that controls cracks
// (24.3.2), and the depth beyond which side faces need bars (9.7.2.3), in the
// units of an edition.
type crackRules struct {
	most     float64 // length: 15(40,000/fs) - 2.5cc
	upper    float64 // length: 12(40,000/fs)
	stress   float64 // 40,000
	perCover float64 // of cc
	share    float64 // of fy, the stress that may be taken for fs, 24.3.2.1

	deep float64 // h above which side-face bars are needed, 9.7.2.3

	// Steel against shrinkage and temperature, 24.4.3.2: in 318-14 by the grade,
	// with shrinkageWeak below Grade 60 and no less than shrinkageLeast above.
	shrinkage, shrinkageWeak, shrinkageLeast float64
	shrinkageByYield                         bool
}

var (
	crack14US = crackRules{
		most: 15, upper: 12, stress: 40000, perCover: 2.5, share: 2.0 / 3, deep: 36,
		shrinkage: 0.0018, shrinkageWeak: 0.0020, shrinkageLeast: 0.0014, shrinkageByYield: true,
	}
	crack14SI = crackRules{
		most: 380, upper: 300, stress: 280, perCover: 2.5, share: 2.0 / 3, deep: 900,
		shrinkage: 0.0018, shrinkageWeak: 0.0020, shrinkageLeast: 0.0014, shrinkageByYield: true,
	}
	crack19US = crackRules{most: 15, upper: 12, stress: 40000, perCover: 2.5, share: 2.0 / 3, deep: 36, shrinkage: 0.0018}
	crack19SI = crackRules{most: 380, upper: 300, stress: 280, perCover: 2.5, share: 2.0 / 3, deep: 900, shrinkage: 0.0018}
)

// crackStress is fs of 24.3.2.1 where it is not computed: a share of fy.
func (e *edition) crackStress(yield units.Stress) units.Stress { return yield.Scale(e.crack.share) }

// crackSpacing is the greatest spacing between centres of the bars nearest a
// tension face (Table 24.3.2) at a stress fs under service loads, with the
// clear cover cc from them to that face; zero where so much cover leaves none.
func (e *edition) crackSpacing(fs units.Stress, cc units.Length) units.Length {
	r := &e.crack
	k := r.stress / e.stressIn(fs)
	return e.lengthOf(max(0, min(r.most*k-r.perCover*e.lengthIn(cc), r.upper*k)))
}

// crackSteps writes the working of crackSpacing.
func (e *edition) crackSteps(w *working, yield units.Stress, cc units.Length) {
	r := &e.crack
	w.given("fy", "yield strength of the bars", "", e.asStress(e.stressIn(yield)))
	w.given("cc", "clear cover from the bars to the face", "", e.asLength(e.lengthIn(cc)))
	w.find("fs", "stress under service loads, as permitted without computing it", "24.3.2.1",
		"2 / 3 fy", e.asStress(e.stressIn(e.crackStress(yield))))
	ratio := number(r.stress) + " / fs"
	w.find("s,max", "greatest spacing between centres", "Table 24.3.2",
		"max(min("+number(r.most)+" ("+ratio+") - "+number(r.perCover)+" cc, "+number(r.upper)+" ("+ratio+")), 0)",
		e.asLength(e.lengthIn(e.crackSpacing(e.crackStress(yield), cc))))
}
