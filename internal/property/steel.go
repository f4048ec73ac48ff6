package property

import "math"

const zeroCelsius = 273.15 // K

// CarbonSteel is carbon steel by EN 1993-1-2:2005, clause 3.4.1. The specific heat was read on a page
// that quotes the clause; the slope 3.33e-2 of the conductivity is from memory. Below 20 °C, where
// the clause begins, the first pieces are continued.
type CarbonSteel struct{}

// Conductivity returns 54 − 3.33e-2 t below 800 °C and 27.3 from there.
func (CarbonSteel) Conductivity(t float64) float64 {
	t -= zeroCelsius
	if t < 800 {
		return 54 - 3.33e-2*t
	}
	return 27.3
}

// SpecificHeat has a peak of 5000 J/(kg K) at 735 °C. The pieces do not quite meet: it goes from 759.9 to
// 760.2 at 600 °C and from 650.4 to 650 at 900 °C.
func (CarbonSteel) SpecificHeat(t float64) float64 {
	t -= zeroCelsius
	switch {
	case t < 600:
		return 425 + t*(0.773+t*(-1.69e-3+t*2.22e-6))
	case t < 735:
		return 666 + 13002/(738-t)
	case t < 900:
		return 545 + 17820/(t-731)
	}
	return 650
}

// Enthalpy is the exact integral of the pieces, zero at 0 °C.
func (CarbonSteel) Enthalpy(t float64) float64 {
	t -= zeroCelsius
	switch {
	case t < 600:
		return steelCubic(t)
	case t < 735:
		return steelCubic(600) + 666*(t-600) + 13002*math.Log(138/(738-t))
	case t < 900:
		return steelAt735 + 545*(t-735) + 17820*math.Log((t-731)/4)
	}
	return steelAt900 + 650*(t-900)
}

func steelCubic(t float64) float64 {
	return t * (425 + t*(0.773/2+t*(-1.69e-3/3+t*(2.22e-6/4))))
}

var (
	steelAt735 = steelCubic(600) + 666*135 + 13002*math.Log(138.0/3)
	steelAt900 = steelAt735 + 545*165 + 17820*math.Log(169.0/4)
)
