package property

import "math"

// A Part is a constituent of a mixture, with its fractions by volume and by mass.
type Part struct {
	Curve        Curve
	Volume, Mass float64
}

// Structure tells how the parts of a mixture conduct together.
type Structure uint8

// The structures.
const (
	Dispersed Structure = iota // the first part is continuous
	Parallel
	Series
	Geometric
)

// Mix is a mixture of parts. The specific heat and the enthalpy add by mass.
type Mix struct {
	Structure Structure
	Parts     []Part
}

// Conductivity combines those of the parts. Dispersed is the equation of Maxwell and Eucken for spheres, with several kinds of
// them: (1 + 2 s)/(1 − s) times the conductivity of the first part, s = Σ φ (k − k₁)/(k + 2 k₁).
func (m *Mix) Conductivity(t float64) float64 {
	sum := 0.0
	switch m.Structure {
	case Parallel:
		for i := range m.Parts {
			sum += m.Parts[i].Volume * m.Parts[i].Curve.Conductivity(t)
		}
		return sum
	case Series:
		for i := range m.Parts {
			sum += m.Parts[i].Volume / m.Parts[i].Curve.Conductivity(t)
		}
		return 1 / sum
	case Geometric:
		for i := range m.Parts {
			sum += m.Parts[i].Volume * math.Log(m.Parts[i].Curve.Conductivity(t))
		}
		return math.Exp(sum)
	}
	k1 := m.Parts[0].Curve.Conductivity(t)
	for _, p := range m.Parts[1:] {
		k := p.Curve.Conductivity(t)
		sum += p.Volume * (k - k1) / (k + 2*k1)
	}
	return k1 * (1 + 2*sum) / (1 - sum)
}

// SpecificHeat adds by mass.
func (m *Mix) SpecificHeat(t float64) float64 {
	sum := 0.0
	for i := range m.Parts {
		sum += m.Parts[i].Mass * m.Parts[i].Curve.SpecificHeat(t)
	}
	return sum
}

// Enthalpy adds by mass.
func (m *Mix) Enthalpy(t float64) float64 {
	sum := 0.0
	for i := range m.Parts {
		sum += m.Parts[i].Mass * m.Parts[i].Curve.Enthalpy(t)
	}
	return sum
}

// Moist is a solid with liquid water: the conductivity is Factor times that of the dry solid, the specific heat
// that of both by mass. Content is the mass of water per mass of dry solid.
type Moist struct {
	Dry             Curve
	Factor, Content float64
}

// WaterHeat is the specific heat of liquid water in moist solids, J/(kg K), a mean from 0 °C to 100 °C.
const WaterHeat = 4190.0

// Conductivity returns that of the dry solid times the factor.
func (m *Moist) Conductivity(t float64) float64 { return m.Factor * m.Dry.Conductivity(t) }

// SpecificHeat is per mass of the moist solid.
func (m *Moist) SpecificHeat(t float64) float64 {
	return (m.Dry.SpecificHeat(t) + m.Content*WaterHeat) / (1 + m.Content)
}

// Enthalpy is the integral of the specific heat.
func (m *Moist) Enthalpy(t float64) float64 {
	return (m.Dry.Enthalpy(t) + m.Content*WaterHeat*t) / (1 + m.Content)
}
