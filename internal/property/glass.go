package property

// Glass is soda-lime glass: a constant conductivity K, and the specific heat of an oxide glass by D. E. Sharp and
// L. B. Ginther, J. Am. Ceram. Soc. 34 (1951) 260–271, from memory. The mean specific heat between 0 °C and
// t is (a t + c)/(0.00146 t + 1) cal/(g °C), where a and c add over the oxides by mass.
type Glass struct{ K float64 }

// The sums over an ordinary float glass by mass: SiO2 0.72, Na2O 0.14, CaO 0.09, MgO 0.04, Al2O3 0.01.
const (
	calorie = 4184.0 // J/(kg K) in one thermochemical cal/(g °C)
	glassA  = calorie * (0.72*0.000468 + 0.14*0.000829 + 0.09*0.000410 + 0.04*0.000514 + 0.01*0.000453)
	glassC  = calorie * (0.72*0.1657 + 0.14*0.2229 + 0.09*0.1709 + 0.04*0.2142 + 0.01*0.1765)
	glassB  = 0.00146
)

// Conductivity returns the constant conductivity.
func (g Glass) Conductivity(float64) float64 { return g.K }

// SpecificHeat is the derivative of t times the mean specific heat.
func (Glass) SpecificHeat(t float64) float64 {
	t -= zeroCelsius
	d := glassB*t + 1
	return (t*(glassA*glassB*t+2*glassA) + glassC) / (d * d)
}

// Enthalpy is t times the mean specific heat, zero at 0 °C.
func (Glass) Enthalpy(t float64) float64 {
	t -= zeroCelsius
	return t * (glassA*t + glassC) / (glassB*t + 1)
}
