package props

import (
	"slices"

	"example.com/coolward/units"
)

// A Medium is a fluid of this package, such as [Air] or [Water]. It is a small
// value that many goroutines may use at once. The zero Medium has no name, and its At returns an error.
type Medium struct{ m *medium }

var _ Fluid = Medium{}

// medium is the data of a fluid. It is not changed once it is made.
type medium struct {
	name        string
	synonyms    []string
	source      string
	low, high   float64                       // K
	pLow, pHigh float64                       // Pa; a liquid has boiling instead of pLow
	boiling     func(t float64) float64       // Pa, the least pressure of a liquid; nil for a gas
	condensing  func(t float64) float64       // Pa, where a gas condenses, if that can be below pHigh; else nil
	at          func(t, p float64) FluidState // within the range
	uncertainty fluidUncertainty
}

// fluidUncertainty is relative, at about 95 %.
type fluidUncertainty struct {
	density, specificHeat, conductivity, viscosity float64
	source                                         string
}

// Name returns the name, such as "air".
func (f Medium) Name() string {
	if f.m == nil {
		return ""
	}
	return f.m.name
}

// String returns the name.
func (f Medium) String() string {
	if f.m == nil {
		return "no fluid"
	}
	return f.m.name
}

// Synonyms returns further names under which [FindFluid] knows the fluid.
func (f Medium) Synonyms() []string {
	if f.m == nil {
		return nil
	}
	return slices.Clone(f.m.synonyms)
}

// Source says where the numbers come from, and whether they were read or recalled.
func (f Medium) Source() string {
	if f.m == nil {
		return ""
	}
	return f.m.source
}

// Range returns the lowest and the highest temperature.
func (f Medium) Range() (low, high units.Temperature) {
	if f.m == nil {
		return
	}
	return units.Kelvin.Of(f.m.low), units.Kelvin.Of(f.m.high)
}

// PressureRange returns the lowest and the highest pressure at temperature T. The lowest pressure of a liquid is
// the one at which it boils, and the highest of a gas is at most the one at which it condenses. At returns a range
// error outside these limits, and so does PressureRange if T is outside [Medium.Range].
func (f Medium) PressureRange(T units.Temperature) (low, high units.Pressure, err error) {
	if err := f.check(T); err != nil {
		return low, high, err
	}
	return units.Pascal.Of(f.m.leastPressure(T.SI())), units.Pascal.Of(f.m.greatestPressure(T.SI())), nil
}

// DensityUncertainty returns the relative uncertainty of the density, at about 95 %.
func (f Medium) DensityUncertainty() float64 { return f.uncertainty().density }

// SpecificHeatUncertainty returns the relative uncertainty of the specific heat, at about 95 %.
func (f Medium) SpecificHeatUncertainty() float64 { return f.uncertainty().specificHeat }

// ConductivityUncertainty returns the relative uncertainty of the conductivity, at about 95 %.
func (f Medium) ConductivityUncertainty() float64 { return f.uncertainty().conductivity }

// ViscosityUncertainty returns the relative uncertainty of the viscosity, at about 95 %.
func (f Medium) ViscosityUncertainty() float64 { return f.uncertainty().viscosity }

// UncertaintySource says where the uncertainties come from.
func (f Medium) UncertaintySource() string { return f.uncertainty().source }

func (f Medium) uncertainty() fluidUncertainty {
	if f.m == nil {
		return fluidUncertainty{}
	}
	return f.m.uncertainty
}

// At returns the state at temperature T and pressure p. It returns a [*units.RangeError] where the source
// does not support it, and a [*units.ArgumentError] for a T or p that cannot be.
func (f Medium) At(T units.Temperature, p units.Pressure) (FluidState, error) {
	t, pa := T.SI(), p.SI()
	if m := f.m; m != nil && t >= m.low && t <= m.high && pa >= m.leastPressure(t) && pa <= m.greatestPressure(t) {
		return m.at(t, pa), nil
	}
	return FluidState{}, f.refuse(T, p)
}

func (m *medium) leastPressure(t float64) float64 {
	if m.boiling != nil {
		return m.boiling(t)
	}
	return m.pLow
}

func (m *medium) greatestPressure(t float64) float64 {
	if m.condensing != nil {
		return min(m.pHigh, m.condensing(t))
	}
	return m.pHigh
}

// check returns the error for T, if there is one.
func (f Medium) check(T units.Temperature) error {
	if f.m == nil {
		return &units.ArgumentError{Field: "props.Medium", Accepted: "a fluid such as props.Air()"}
	}
	if err := units.CheckTemperature(f.m.name+": temperature", T); err != nil {
		return err
	}
	if low, high := f.Range(); T.SI() < low.SI() || T.SI() > high.SI() {
		return &units.RangeError{
			Model: "properties of " + f.m.name, Quantity: "temperature", Value: T.Dynamic(),
			Min: low.Dynamic(), Max: high.Dynamic(), Source: f.m.source,
		}
	}
	return nil
}

// refuse returns the error for a state outside the range.
func (f Medium) refuse(T units.Temperature, p units.Pressure) error {
	low, high, err := f.PressureRange(T)
	if err != nil {
		return err
	}
	if err := units.CheckPositive(f.m.name+": pressure", p); err != nil {
		return err
	}
	return &units.RangeError{
		Model: "properties of " + f.m.name + " at " + T.String(), Quantity: "pressure", Value: p.Dynamic(),
		Min: low.Dynamic(), Max: high.Dynamic(), Source: f.m.source,
	}
}

func fluidState(t, p, rho, cp, k, mu, beta float64) FluidState {
	return FluidState{
		Temperature:  units.Kelvin.Of(t),
		Pressure:     units.Pascal.Of(p),
		Density:      units.KilogramPerCubicMetre.Of(rho),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(cp),
		Conductivity: units.WattPerMetreKelvin.Of(k),
		Viscosity:    units.PascalSecond.Of(mu),
		Expansion:    units.PerKelvin.Of(beta),
	}
}
