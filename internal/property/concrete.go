package property

// Concrete is dry normal-weight concrete by EN 1992-1-2:2004, clause 3.3, from memory. The clause
// leaves the conductivity between an upper and a lower limit; the mean of the two is taken.
type Concrete struct{}

// Conductivity returns the mean of the limits 2 − 0.2451 x + 0.0107 x² and 1.36 − 0.136 x + 0.0057 x²,
// x = t/100 °C.
func (Concrete) Conductivity(t float64) float64 {
	x := (t - zeroCelsius) / 100
	upper := 2 + x*(-0.2451+x*0.0107)
	lower := 1.36 + x*(-0.136+x*0.0057)
	return (upper + lower) / 2
}

// SpecificHeat returns the dry curve.
func (Concrete) SpecificHeat(t float64) float64 {
	t -= zeroCelsius
	switch {
	case t < 100:
		return 900
	case t < 200:
		return 900 + (t - 100)
	case t < 400:
		return 1000 + (t-200)/2
	}
	return 1100
}

// Enthalpy is the exact integral of the pieces, zero at 0 °C.
func (Concrete) Enthalpy(t float64) float64 {
	t -= zeroCelsius
	switch {
	case t < 100:
		return 900 * t
	case t < 200:
		x := t - 100
		return 90000 + x*(900+x/2)
	case t < 400:
		x := t - 200
		return 185000 + x*(1000+x/4)
	}
	return 395000 + 1100*(t-400)
}
