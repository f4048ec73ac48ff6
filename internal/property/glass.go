package property

// Oxides is the composition of a glass by mass.
type Oxides struct{ SiO2, Na2O, CaO, MgO, Al2O3 float64 }

// Glass is an oxide glass with a constant conductivity and the specific heat of D. E. Sharp and L. B. Ginther, J. Am.
// Ceram. Soc. 34 (1951) 260–271, from memory: the mean specific heat between 0 °C and t is
//
//	(a t + c)/(0.00146 t + 1)    in cal/(g °C)
//
// where a and c add over the oxides by mass.
type Glass struct{ k, a, c float64 }

const glassB = 0.00146 // 1/°C

// NewGlass returns the glass of conductivity k and the composition o.
func NewGlass(k float64, o Oxides) Glass {
	const calorie = 4184.0 // J/(kg K) in one thermochemical cal/(g °C)
	return Glass{
		k: k,
		a: calorie * (0.000468*o.SiO2 + 0.000829*o.Na2O + 0.000410*o.CaO + 0.000514*o.MgO + 0.000453*o.Al2O3),
		c: calorie * (0.1657*o.SiO2 + 0.2229*o.Na2O + 0.1709*o.CaO + 0.2142*o.MgO + 0.1765*o.Al2O3),
	}
}

// Conductivity returns the constant conductivity.
func (g Glass) Conductivity(float64) float64 { return g.k }

// SpecificHeat is the derivative of t times the mean specific heat.
func (g Glass) SpecificHeat(t float64) float64 {
	t -= zeroCelsius
	d := glassB*t + 1
	return (t*(g.a*glassB*t+2*g.a) + g.c) / (d * d)
}

// Enthalpy is t times the mean specific heat, zero at 0 °C.
func (g Glass) Enthalpy(t float64) float64 {
	t -= zeroCelsius
	return t * (g.a*t + g.c) / (glassB*t + 1)
}
