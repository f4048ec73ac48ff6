package surface

import (
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
)

var _ TemperatureCourse = boundary.Course{}.At

// TemperatureCourse gives a temperature as it goes with time: the method At of a [boundary.Course] is one.
type TemperatureCourse = func(t units.Duration) (units.Temperature, error)

// FluxCourse gives a heat flux as it goes with time, such as the irradiance of the sun.
type FluxCourse = func(t units.Duration) (units.HeatFlux, error)

// GivenFlux is a heat flux that the caller knows, whatever the temperature of the wall. The zero
// GivenFlux is a surface that nothing passes, such as one that is insulated for a while.
type GivenFlux struct {
	Value units.HeatFlux // positive out of the body, negative for a heater

	// ValueLow and ValueHigh enclose what the flux may be, for Low and High. Both 0 means that no band is
	// stated.
	ValueLow, ValueHigh units.HeatFlux

	// Course gives the flux as it goes with time, in place of the other fields, which are 0 then.
	Course FluxCourse
}

// Name returns "given flux".
func (g GivenFlux) Name() string { return "given flux" }

// Check returns an [*units.ArgumentError] for a flux that is not finite, for a band that does not
// enclose it, and for both a flux and a course.
func (g GivenFlux) Check() error {
	if g.Course != nil && (g.Value != units.HeatFlux{} || g.hasBand()) {
		return &units.ArgumentError{Field: "given flux: flux", Value: g.Value, Accepted: "0 where there is a course"}
	}
	if err := units.CheckFinite("given flux: flux", g.Value); err != nil {
		return err
	}
	if !g.hasBand() {
		return nil
	}
	if !(g.ValueLow.SI() <= g.Value.SI() && g.ValueLow.IsFinite()) {
		return &units.ArgumentError{Field: "given flux: lower flux", Value: g.ValueLow, Accepted: "finite, up to the flux"}
	}
	if !(g.ValueHigh.SI() >= g.Value.SI() && g.ValueHigh.IsFinite()) {
		return &units.ArgumentError{Field: "given flux: upper flux", Value: g.ValueHigh, Accepted: "finite, from the flux up"}
	}
	return nil
}

func (g GivenFlux) hasBand() bool {
	return g.ValueLow != units.HeatFlux{} || g.ValueHigh != units.HeatFlux{}
}

// Flux returns the flux at time t. Its errors are those of [GivenFlux.Check] and of the course.
func (g GivenFlux) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	if err := g.Check(); err != nil {
		return units.HeatFlux{}, err
	}
	if g.Course == nil {
		return g.Value, nil
	}
	q, err := g.Course(t)
	if err != nil {
		return units.HeatFlux{}, err
	}
	return finite("given flux: flux", q.SI())
}

// Low returns the lower flux, the one that takes less heat out of the body.
func (g GivenFlux) Low() Part { return g.at(g.ValueLow) }

// High returns the upper flux.
func (g GivenFlux) High() Part { return g.at(g.ValueHigh) }

func (g GivenFlux) at(q units.HeatFlux) Part {
	if g.hasBand() && g.Check() == nil {
		return GivenFlux{Value: q}
	}
	return g
}

// Sources returns nothing: the caller knows where the flux is from.
func (g GivenFlux) Sources() []string { return nil }

// Notes says that the flux is given.
func (g GivenFlux) Notes() []string {
	return []string{"given flux: as the caller states, whatever the temperature of the wall"}
}

// Warnings returns nothing.
func (g GivenFlux) Warnings() []string { return nil }

// GivenCoefficient is the heat that flows by a coefficient that the caller knows, q = h (T − ambient): a
// measured one, one of a table, or the contact conductance to a solid that is held at a temperature.
type GivenCoefficient struct {
	Coefficient units.HeatTransferCoefficient // 0 or above

	// CoefficientLow and CoefficientHigh enclose what the coefficient may be, for Low and High. Both 0
	// means that no band is stated.
	CoefficientLow, CoefficientHigh units.HeatTransferCoefficient

	Ambient units.Temperature
}

// Name returns "given coefficient".
func (g GivenCoefficient) Name() string { return "given coefficient" }

// Check returns an [*units.ArgumentError] for a coefficient or an ambient temperature that cannot be,
// and for a band that does not enclose the coefficient.
func (g GivenCoefficient) Check() error {
	if err := units.CheckNotNegative("given coefficient: coefficient", g.Coefficient); err != nil {
		return err
	}
	if g.hasBand() {
		if !(g.CoefficientLow.SI() >= 0 && g.CoefficientLow.SI() <= g.Coefficient.SI()) {
			return &units.ArgumentError{Field: "given coefficient: lower coefficient", Value: g.CoefficientLow, Accepted: "from 0 to the coefficient"}
		}
		if !(g.CoefficientHigh.SI() >= g.Coefficient.SI() && g.CoefficientHigh.IsFinite()) {
			return &units.ArgumentError{Field: "given coefficient: upper coefficient", Value: g.CoefficientHigh, Accepted: "finite, from the coefficient up"}
		}
	}
	return units.CheckTemperature("given coefficient: ambient", g.Ambient)
}

func (g GivenCoefficient) hasBand() bool {
	return g.CoefficientLow != units.HeatTransferCoefficient{} || g.CoefficientHigh != units.HeatTransferCoefficient{}
}

// Flux returns h (wall − ambient). It does not depend on t. It returns the errors of
// [GivenCoefficient.Check], and an [*units.ArgumentError] for a wall that is not above 0 K.
func (g GivenCoefficient) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	if err := g.Check(); err != nil {
		return units.HeatFlux{}, err
	}
	if err := units.CheckTemperature("given coefficient: wall", wall); err != nil {
		return units.HeatFlux{}, err
	}
	return finite("given coefficient: flux", g.Coefficient.SI()*(wall.SI()-g.Ambient.SI()))
}

// In returns the same coefficient in another ambient temperature.
func (g GivenCoefficient) In(ambient units.Temperature) Part {
	g.Ambient = ambient
	return g
}

// Low returns the same exchange with the lower coefficient.
func (g GivenCoefficient) Low() Part { return g.at(g.CoefficientLow) }

// High returns the same exchange with the upper coefficient.
func (g GivenCoefficient) High() Part { return g.at(g.CoefficientHigh) }

// at fixes the coefficient. One that fails its check stays as it is, so that it goes on failing.
func (g GivenCoefficient) at(h units.HeatTransferCoefficient) Part {
	if g.hasBand() && g.Check() == nil {
		return GivenCoefficient{Coefficient: h, Ambient: g.Ambient}
	}
	return g
}

// Sources returns nothing: the caller knows where the coefficient is from.
func (g GivenCoefficient) Sources() []string { return nil }

// Notes says that the coefficient is given.
func (g GivenCoefficient) Notes() []string {
	return []string{"given coefficient: as the caller states, the same at every temperature of the wall"}
}

// Warnings returns nothing.
func (g GivenCoefficient) Warnings() []string { return nil }
