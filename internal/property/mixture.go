package property

// MixtureParts is the number of gases that a [GasMixture] may hold.
const MixtureParts = 5

// GasMixture is a mixture of ideal gases at low pressure. Viscosity: C. R. Wilke, J. Chem. Phys. 18 (1950) 517–519.
// Conductivity: A. Wassiljewa, Physik. Z. 5 (1904) 737–742, with the factors of E. A. Mason, S. C. Saxena, Phys. Fluids 1
// (1958) 361–369, in the form in which they equal those of Wilke (B. E. Poling, J. M. Prausnitz, J. P. O'Connell, The Properties of
// Gases and Liquids, 5th ed., section 10-6, from memory).
type GasMixture struct {
	n         int
	gas       [MixtureParts]*idealGas
	x         [MixtureParts]float64 // mole fractions
	mass      [MixtureParts]float64 // mass fractions
	molarMass float64
}

// NewGasMixture returns the mixture with the mole fractions of nitrogen, oxygen, argon, carbon dioxide and steam, which add up to 1.
func NewGasMixture(fractions [MixtureParts]float64) *GasMixture {
	m := new(GasMixture)
	for i, g := range [MixtureParts]*idealGas{&nitrogen, &oxygen, &argon, &carbonDioxide, &diluteSteam} {
		if x := fractions[i]; x > 0 {
			m.gas[m.n], m.x[m.n] = g, x
			m.molarMass += x * g.molarMass
			m.n++
		}
	}
	for i := range m.n {
		m.mass[i] = m.x[i] * m.gas[i].molarMass / m.molarMass
	}
	return m
}

// At returns density, isobaric specific heat, thermal conductivity and viscosity at the temperature t and the pressure p.
func (m *GasMixture) At(t, p float64) (rho, cp, k, mu float64) {
	var ks, mus [MixtureParts]float64
	for i := range m.n {
		ks[i], mus[i] = m.gas[i].dilute(t)
		cp += m.mass[i] * m.gas[i].specificHeat(t)
	}
	k, mu = m.transport(&ks, &mus)
	return p * m.molarMass / (gasConstant * t), cp, k, mu
}

// transport mixes the conductivities and viscosities of the components.
func (m *GasMixture) transport(ks, mus *[MixtureParts]float64) (k, mu float64) {
	for i := range m.n {
		sum := m.x[i]
		for j := range m.n {
			if j != i {
				sum += m.x[j] * wilke(mus[i]/mus[j], m.gas[i].molarMass/m.gas[j].molarMass)
			}
		}
		k += m.x[i] * ks[i] / sum
		mu += m.x[i] * mus[i] / sum
	}
	return k, mu
}
