package property

// Constant is a solid whose properties do not depend on the temperature.
type Constant struct{ K, C float64 }

// Conductivity returns the constant conductivity.
func (c Constant) Conductivity(float64) float64 { return c.K }

// SpecificHeat returns the constant specific heat.
func (c Constant) SpecificHeat(float64) float64 { return c.C }

// Enthalpy returns c T, which is zero at 0 K.
func (c Constant) Enthalpy(t float64) float64 { return c.C * t }
