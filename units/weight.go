package units

// Weights take standard gravity, 9.80665 m/s2 (CGPM 1901), by which a pound
// of mass weighs a pound of force.

// Weight returns the weight of q.
func (q Mass) Weight() Force { return Force{q.kg * gravity} }

// Weight returns the weight per length of q.
func (q MassPerLength) Weight() LineLoad { return LineLoad{q.kgPerM * gravity} }

// Weight returns the weight per volume of q.
func (q Density) Weight() UnitWeight { return UnitWeight{q.kgPerM3 * gravity} }

// Density returns the density of a material of unit weight q.
func (q UnitWeight) Density() Density { return Density{q.nPerM3 / gravity} }
