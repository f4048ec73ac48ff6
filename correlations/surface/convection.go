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
// buoyant flow, unless Stream says that it may run against it. It runs across a cylinder and along a plate; where it is at an angle
// to the axis of a long cylinder, Speed is the part of it across the axis (see [correlations.YawedRe]).
//
// The body is a ball or a shell, a cylinder or a tube without its ends, a plate without its edges, or any compact body: a brick, a
// cylinder with ends, a cone, one that was weighed and wrapped. Its inside must not be exposed.
type Convection struct {
	Body     shape.Body
	Position Position // needed but for a ball, and for a compact body whose Length is given

	// Length is the length of a plate along the slope if it is upright, and along the stream if it is level; and the height
	// of a compact body, such as a brick or a cylinder with ends. It is 0 for a ball and a long cylinder, whose measures say it, and may be
	// 0 for a brick or a round body whose position says it, for one that is as high in all positions, such as a cube, and for a level
	// disk in a fluid at rest.
	Length units.Length

	// Inclination is that of an upright plate from the vertical, 0° to 60°.
	Inclination units.Angle

	Fluid    props.Fluid        // such as props.Air()
	Pressure units.Pressure     // 0 means 101 325 Pa
	Ambient  units.Temperature  // of the fluid far from the body
	Speed    units.Velocity     // of the fluid past the body, 0 or above; 0 means at rest
	Stream   Stream             // whether it runs up or down, where it may run against the buoyant flow; not for an upright cylinder and a level plate
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

// notes says where in the scatter an exchange is taken, if it is not the middle.
func (l limit) notes(part string) []string {
	switch {
	case l < 0:
		return []string{part + ": at the lower limit of the scatter"}
	case l > 0:
		return []string{part + ": at the upper limit of the scatter"}
	}
	return nil
}

const (
	standardPressure = 101325  // Pa, standard atmosphere, CODATA
	standardGravity  = 9.80665 // m/s², 3rd CGPM (1901)
)

// Name returns "convection".
func (c Convection) Name() string { return "convection" }

// Check returns an [*units.ArgumentError] for a body, a position, a length, an inclination, a fluid, a temperature, a speed, a
// stream, a pressure or a gravity that cannot be.
func (c Convection) Check() error { return c.check() }

func (c *Convection) check() error { return c.checkAs(c.form()) }

// checkAs is check with the form of the body.
func (c *Convection) checkAs(f form) error {
	if err := c.Body.Check(); err != nil {
		return err
	}
	if err := c.checkForm(f); err != nil {
		return err
	}
	if err := c.checkStream(f); err != nil {
		return err
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
	var s surroundings
	if err := c.film(&f, &s, wall); err != nil {
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

// In returns the same convection in another ambient temperature.
func (c Convection) In(ambient units.Temperature) Part {
	c.Ambient = ambient
	return c
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
	if c.Insist != (correlations.Correlation{}) {
		return append(list, c.Insist.Source())
	}
	for _, with := range c.candidates() {
		list = append(list, with.Source())
	}
	if c.Speed.SI() > 0 {
		list = append(list, "mixed convection: "+correlations.MixSource)
	}
	return list
}

// Notes returns the assumptions.
func (c Convection) Notes() []string {
	list := []string{"convection: smooth body of one surface temperature, far from walls and other bodies; " +
		"the coefficient is the mean over the surface, without the higher one just after a sudden change"}
	if c.Insist != (correlations.Correlation{}) {
		list = append(list, "convection: "+c.Insist.Name()+" alone, as the caller insists")
	} else if note := c.formNote(); note != "" {
		list = append(list, "convection: "+note)
	}
	return append(list, c.limit.notes("convection")...)
}

// formNote returns what is taken for granted of the form of the body.
func (c *Convection) formNote() string {
	switch c.form() {
	case levelCylinder, uprightCylinder:
		return "long cylinder without its ends; a stream runs across it"
	case uprightPlate, levelPlate:
		return "plate without its edges; a stream runs along it, laminar from a sharp edge to a Reynolds number of 5e5"
	case compactBody:
		return "body of any form by its surface and its height: the gravity function, the Nusselt number at rest and the girth are our own means, 5 to 10 %"
	}
	return ""
}

// uncertain goes with every number. What a hot surface does to skin is said once, by the answer that the number goes into.
const uncertain = "convection: the coefficient is good to its scatter, mostly 10 to 45 %: take what is cool enough, or safe to store, from the slow end of the band"

// Warnings returns what a reader must know before using a number from this convection.
func (c Convection) Warnings() []string {
	list := []string{uncertain}
	if c.Speed.SI() > 0 && c.Insist == (correlations.Correlation{}) {
		if c.Stream == AnyStream {
			list = append(list, "convection: a stream against the buoyant flow can give a lower coefficient than the blend of forced and natural convection; for one that runs up or down the field Stream says so")
		} else {
			list = append(list, "convection: where the stream runs against the buoyant flow and one of forced and natural convection is 0.5 to 2 times the other, no formula is known to hold: the published one falls to conduction there, ours to 63 % of the larger, and the scatter reaches up to that")
		}
		switch c.form() {
		case uprightPlate, levelPlate:
			list = append(list, "convection: a blunt edge or a turbulent stream, as from a fan, can double the coefficient of a plate below a Reynolds number of 5e5; correlations.GnielinskiPlate is for that")
		}
	}
	if c.Inclination.SI() != 0 {
		list = append(list, "convection: the face of an inclined plate that looks up when it is hot gives more than this once the flow leaves it")
	}
	if c.Extrapolate {
		list = append(list, "convection: groups outside the published ranges are admitted, as the caller asks; the scatter is not known there")
	}
	return list
}

func (c *Convection) pressure() units.Pressure {
	if c.Pressure.SI() == 0 {
		return units.Pascal.Of(standardPressure)
	}
	return c.Pressure
}

// state is what the correlations need of a fluid at one temperature, in SI units.
type state struct {
	k, nu, mu, pr, beta, specificHeat float64
	gas                               bool
}

// at writes the fluid at T to x. It returns an error also if the fluid gives properties that cannot be.
func (c *Convection) at(x *state, T units.Temperature) error {
	s, err := c.Fluid.At(T, c.pressure())
	if err != nil {
		return err
	}
	x.k, x.mu, x.specificHeat = s.Conductivity.SI(), s.Viscosity.SI(), s.SpecificHeat.SI()
	x.nu, x.pr = x.mu/s.Density.SI(), x.mu*x.specificHeat/x.k
	x.beta, x.gas = s.Expansion.SI(), s.Gas
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
