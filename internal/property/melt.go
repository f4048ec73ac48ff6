package property

import "gonum.org/v1/gonum/interp"

// Melt is a material that melts between solidus and liquidus, or at one temperature if they are equal. The
// liquid fraction may jump at both, and the enthalpy with it: there is a plateau.
type Melt struct {
	solid, liquid     Curve
	solidus, liquidus float64
	atSolidus         float64 // enthalpy of the solid there
	aboveSolidus      float64 // enthalpy at the upper end of the plateau of the solidus
	belowLiquidus     float64 // enthalpy at the lower end of the plateau of the liquidus
	atLiquidus        float64 // enthalpy of the liquid there
	shift             float64 // from the enthalpy of the curve of the liquid to ours
	mushy             *mushy  // nil if solidus and liquidus are equal
}

// mushy is the mixture between solidus and liquidus.
type mushy struct {
	sensible *Table                // conductivity, specific heat without the latent heat
	fraction interp.FritschButland // of liquid
	latent   float64
	zero     float64
}

// NewMelt returns the material with the latent heat and the liquid fractions at equidistant temperatures from solidus
// to liquidus, which do not fall; nil if these are equal.
func NewMelt(solid, liquid Curve, solidus, liquidus, latent float64, fraction []float64) (*Melt, error) {
	m := &Melt{solid: solid, liquid: liquid, solidus: solidus, liquidus: liquidus}
	m.atSolidus = solid.Enthalpy(solidus)
	m.aboveSolidus, m.belowLiquidus = m.atSolidus, m.atSolidus
	m.atLiquidus = m.atSolidus + latent
	if fraction != nil {
		n := len(fraction)
		t, k, c := make([]float64, n), make([]float64, n), make([]float64, n)
		ks, kl := solid.Conductivity(solidus), liquid.Conductivity(liquidus)
		cs, cl := solid.SpecificHeat(solidus), liquid.SpecificHeat(liquidus)
		for i, f := range fraction {
			t[i] = solidus + (liquidus-solidus)*float64(i)/float64(n-1)
			k[i], c[i] = (1-f)*ks+f*kl, (1-f)*cs+f*cl
		}
		t[n-1] = liquidus
		sensible, err := NewTable(t, k, c)
		if err != nil {
			return nil, err
		}
		m.mushy = &mushy{sensible: sensible, latent: latent, zero: m.atSolidus}
		if err := m.mushy.fraction.Fit(t, fraction); err != nil {
			return nil, err
		}
		m.aboveSolidus = m.mushy.Enthalpy(solidus)
		m.belowLiquidus = m.mushy.Enthalpy(liquidus)
		m.atLiquidus = m.belowLiquidus + latent*(1-fraction[n-1])
	}
	m.shift = m.atLiquidus - liquid.Enthalpy(liquidus)
	return m, nil
}

// Conductivity is that of the solid up to the solidus and that of the liquid from above the liquidus. Between, the
// mean by the liquid fraction is taken.
func (m *Melt) Conductivity(t float64) float64 { return m.of(t).Conductivity(t) }

// SpecificHeat includes the latent heat between solidus and liquidus, but not that of a plateau.
func (m *Melt) SpecificHeat(t float64) float64 { return m.of(t).SpecificHeat(t) }

// Enthalpy is at a plateau that of its lower end.
func (m *Melt) Enthalpy(t float64) float64 {
	h := m.of(t).Enthalpy(t)
	if t > m.liquidus {
		h += m.shift
	}
	return h
}

func (m *Melt) of(t float64) Curve {
	switch {
	case t <= m.solidus:
		return m.solid
	case t <= m.liquidus:
		return m.mushy
	}
	return m.liquid
}

// Invert returns the temperature at which the enthalpy is h, or that of the plateau that holds it.
func (m *Melt) Invert(h, low, high float64) float64 {
	switch {
	case h <= m.atSolidus:
		return Invert(m.solid, h, low, m.solidus)
	case h <= m.aboveSolidus:
		return m.solidus
	case h < m.belowLiquidus:
		return Invert(m.mushy, h, m.solidus, m.liquidus)
	case h <= m.atLiquidus:
		return m.liquidus
	}
	return Invert(m.liquid, h-m.shift, m.liquidus, high)
}

func (m *mushy) Conductivity(t float64) float64 { return m.sensible.Conductivity(t) }

func (m *mushy) SpecificHeat(t float64) float64 {
	return m.sensible.SpecificHeat(t) + m.latent*m.fraction.PredictDerivative(t)
}

func (m *mushy) Enthalpy(t float64) float64 {
	return m.zero + m.sensible.Enthalpy(t) + m.latent*m.fraction.Predict(t)
}
