package surface

import (
	"math"

	"example.com/coolward/correlations"
	"example.com/coolward/props"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// Convection is the heat that a fluid takes from a body by natural and forced convection together,
// from published correlations that are evaluated anew at every wall temperature.
//
// In a fluid at rest it is natural convection. In a stream forced and natural convection are blended,
// at any speed, so that neither begins with a jump. The stream is taken to run along or across the
// buoyant flow; in one against it the coefficient can be lower.
type Convection struct {
	Body     shape.Body
	Fluid    props.Fluid        // such as props.Air()
	Pressure units.Pressure     // 0 means 101 325 Pa
	Ambient  units.Temperature  // of the fluid far from the body
	Speed    units.Velocity     // of the fluid past the body, 0 or above; 0 means at rest
	Gravity  units.Acceleration // 0 means 9.80665 m/s²

	// Insist names the one correlation to use, alone and unblended. The zero value chooses by the
	// groups.
	Insist correlations.Correlation

	// Extrapolate admits groups outside the published ranges. A film that made use of it says so.
	Extrapolate bool

	limit limit
}

// limit is where in the scatter an exchange is taken: -1, 0, +1.
type limit int8

const (
	standardPressure = 101325  // Pa, standard atmosphere, CODATA
	standardGravity  = 9.80665 // m/s², 3rd CGPM (1901)
)

// Name returns "convection".
func (c Convection) Name() string { return "convection" }

// Check returns an [*units.ArgumentError] for a body, a fluid, a temperature, a speed, a pressure or a
// gravity that cannot be.
func (c Convection) Check() error { return c.check() }

func (c *Convection) check() error {
	if err := c.Body.Check(); err != nil {
		return err
	}
	if c.Body.Family() != shape.Spherical {
		return &units.ArgumentError{Field: "convection: body", Value: c.Body.String(), Accepted: "a body that there are correlations for: a sphere"}
	}
	if c.Fluid == nil {
		return &units.ArgumentError{Field: "convection: fluid", Accepted: "a fluid, such as props.Air()"}
	}
	if err := units.CheckNotNegative("convection: pressure", c.Pressure); err != nil {
		return err
	}
	if err := units.CheckTemperature("convection: ambient", c.Ambient); err != nil {
		return err
	}
	if err := units.CheckNotNegative("convection: speed", c.Speed); err != nil {
		return err
	}
	return units.CheckNotNegative("convection: gravity", c.Gravity)
}

// Flux returns h (wall − ambient), positive out of the body, at the coefficient h of [Convection.Film].
// It does not depend on t. Its errors are those of Film.
func (c Convection) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	var f Film
	if err := c.film(&f, wall); err != nil {
		return units.HeatFlux{}, err
	}
	return finite("convection: flux", f.Coefficient.SI()*(wall.SI()-c.Ambient.SI()))
}

// finite returns q in W/m², or an [*units.ArgumentError] if it is infinite or no number.
func finite(field string, q float64) (units.HeatFlux, error) {
	flux := units.WattPerSquareMetre.Of(q)
	if !flux.IsFinite() {
		return units.HeatFlux{}, &units.ArgumentError{Field: field, Value: flux, Accepted: "temperatures and sizes that give a finite one"}
	}
	return flux, nil
}

// Low returns the same convection at the lower limit of the scatter of its correlations.
func (c Convection) Low() Part {
	c.limit = -1
	return c
}

// High returns the same convection at the upper limit of the scatter of its correlations.
func (c Convection) High() Part {
	c.limit = +1
	return c
}

// Sources returns the sources of the fluid and of the correlations that the choice is made among.
func (c Convection) Sources() []string {
	var list []string
	if c.Fluid != nil {
		list = append(list, c.Fluid.Name()+": "+c.Fluid.Source())
	}
	switch {
	case c.Insist != (correlations.Correlation{}):
		return append(list, c.Insist.Source())
	case c.Speed.SI() > 0:
		return append(list, correlations.WhitakerSphere().Source(), correlations.RanzMarshallSphere().Source(),
			correlations.ChurchillSphere().Source(), "mixed convection: "+correlations.MixSource)
	}
	return append(list, correlations.ChurchillSphere().Source())
}

// Notes returns the assumptions.
func (c Convection) Notes() []string {
	list := []string{"convection: smooth body of one surface temperature, far from walls and other bodies; " +
		"the coefficient is the mean over the surface, without the higher one just after a sudden change"}
	if c.Insist != (correlations.Correlation{}) {
		list = append(list, "convection: "+c.Insist.Name()+" alone, as the caller insists")
	}
	switch c.limit {
	case -1:
		list = append(list, "convection: at the lower limit of the scatter of the correlations")
	case +1:
		list = append(list, "convection: at the upper limit of the scatter of the correlations")
	}
	return list
}

// Warnings returns what a reader must know before using a number from this convection.
func (c Convection) Warnings() []string {
	var list []string
	if c.Speed.SI() > 0 && c.Insist == (correlations.Correlation{}) {
		list = append(list, "convection: a stream against the buoyant flow can give a lower coefficient than the blend of forced and natural convection")
	}
	if c.Extrapolate {
		list = append(list, "convection: groups outside the published ranges are admitted, as the caller asks; the scatter is not known there")
	}
	return list
}

// state is what the correlations need of a fluid at one temperature, in SI units.
type state struct {
	k, nu, mu, pr, beta float64
	gas                 bool
}

// at writes the fluid at T to x. It returns an error also if the fluid gives properties that cannot be.
func (c *Convection) at(x *state, T units.Temperature) error {
	p := c.Pressure
	if p.SI() == 0 {
		p = units.Pascal.Of(standardPressure)
	}
	s, err := c.Fluid.At(T, p)
	if err != nil {
		return err
	}
	*x = state{
		k:    s.Conductivity.SI(),
		mu:   s.Viscosity.SI(),
		nu:   s.Viscosity.SI() / s.Density.SI(),
		pr:   s.Viscosity.SI() * s.SpecificHeat.SI() / s.Conductivity.SI(),
		beta: s.Expansion.SI(),
		gas:  s.Gas,
	}
	if !(positive(x.k) && positive(x.mu) && positive(x.nu) && positive(x.pr) && math.Abs(x.beta) <= math.MaxFloat64) {
		return &units.ArgumentError{
			Field:    "convection: fluid " + c.Fluid.Name() + " at " + T.String(),
			Value:    s,
			Accepted: "density, specific heat, conductivity and viscosity finite and above 0, a finite expansion coefficient",
		}
	}
	return nil
}

func positive(x float64) bool { return x > 0 && x <= math.MaxFloat64 }
