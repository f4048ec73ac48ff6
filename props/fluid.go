package props

import "example.com/coolward/units"

// A Fluid gives the properties of a gas or liquid. Those of the package are fluids, such as [Air] and [Water]; a type of the user
// with these methods is one as well.
type Fluid interface {
	// At returns the state at temperature T and pressure p, or an error if the source does not
	// support it: a [*units.RangeError] outside the range.
	At(T units.Temperature, p units.Pressure) (FluidState, error)
	Name() string
	Source() string
}

// A FluidState holds the properties of a fluid at one temperature and pressure.
type FluidState struct {
	Temperature  units.Temperature
	Pressure     units.Pressure
	Density      units.Density
	SpecificHeat units.SpecificHeat // at constant pressure
	Conductivity units.Conductivity
	Viscosity    units.Viscosity            // dynamic viscosity µ
	Expansion    units.ExpansionCoefficient // β = −(1/ρ) (∂ρ/∂T) at constant pressure; may be negative
	Gas          bool                       // true for a gas, false for a liquid
}

// Prandtl returns Pr = µ c / k. It is NaN for the zero state.
func (s FluidState) Prandtl() float64 {
	return s.Viscosity.SI() * s.SpecificHeat.SI() / s.Conductivity.SI()
}

// KinematicViscosity returns ν = µ/ρ. It is NaN for the zero state.
func (s FluidState) KinematicViscosity() units.Diffusivity {
	return units.SquareMetrePerSecond.Of(s.Viscosity.SI() / s.Density.SI())
}

// Diffusivity returns the thermal diffusivity a = k/(ρ c). It is NaN for the zero state.
func (s FluidState) Diffusivity() units.Diffusivity {
	return units.SquareMetrePerSecond.Of(s.Conductivity.SI() / (s.Density.SI() * s.SpecificHeat.SI()))
}
