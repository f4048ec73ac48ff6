package surface

import (
	"math"

	"example.com/coolward/internal/pow"
	"example.com/coolward/internal/property"
	"example.com/coolward/props"
	"example.com/coolward/units"
)

// AnalogySource is where the mass transfer of [Evaporation] comes from.
const AnalogySource = "T. H. Chilton and A. P. Colburn, Mass transfer (absorption) coefficients, Ind. Eng. Chem. 26 (1934) 1183-1187, j factors (ranges 0.6 < Pr < 60 and 0.6 < Sc < 3000 read on a page, bibliography from memory); " +
	"Stefan flow: R. B. Bird, W. E. Stewart and E. N. Lightfoot, Transport Phenomena, film theory (from memory); diffusivity: W. J. Massman, Atmos. Environ. 32 (1998) 1111 (from memory)"

const (
	// analogyScatter is what the analogy, the diffusivity and the composition of the film add to the scatter of the
	// convection, our own estimate: 7 % in the diffusivity and as much in the exponent.
	analogyScatter = 0.10

	vapourHeat   = 1880   // J/(kg K), specific heat of water vapour, 1859 at 0 °C and 1890 at 100 °C (IAPWS R7-97, ideal gas)
	triplePoint  = 273.16 // K
	coldestWet   = 253.15 // K, where the diffusivity begins
	lewisPower   = 2.0 / 3
	wetAdvice    = "a wall below the boiling point, at which the share of vapour at the wall is below 1"
	wetBodyModel = "evaporation of water"
)

// Evaporation is the heat that water takes with it when it evaporates from a wet surface into air, by the analogy with the
// convection of the same body when it is dry, and the heat that condensation brings where the wall is below the dew
// point. With h of the dry body, the mass fractions Y of the vapour at the wall and in the air, and Le = a/D,
//
//	m″ = h/cp Le^(−2/3) ln(1 + B), B = (Yw − Y)/(1 − Yw)
//	q  = m″ L(Tw) + (x/(e^x − 1) − 1) h (Tw − T), x = m″ cp,vapour/h
//
// after [AnalogySource]. The logarithm and the second term of q are the flow of the vapour away from the wall; the heat of the dry
// convection is not in q, so that both go into one [Sum]:
//
//	wet := surface.Sum{dry, surface.Evaporation{Convection: dry, VapourPressure: air.VapourPressure}}
//
// Below 273.16 K the surface carries ice, and the heat of sublimation makes a step there of 13 %. The whole surface is wet; see [Shade] where a share is.
// A film of water is taken as thin, and what drips off takes no heat.
type Evaporation struct {
	// Convection is that of the dry body in air. It may be the part that stands beside this one in a Sum.
	Convection Convection

	// VapourPressure is that of the vapour in the air, such as of a [props.MoistAir]; 0 is dry air.
	VapourPressure units.Pressure

	// CondensesOnly is for a body that carries no water: nothing evaporates from it above the dew point. Dew that has settled earlier is
	// not remembered.
	CondensesOnly bool

	limit limit
}

// Name returns "evaporation".
func (e Evaporation) Name() string { return "evaporation" }

// Check returns an [*units.ArgumentError] for a convection that is not usable, and for a vapour pressure that is below 0 or
// not below the pressure of the air.
func (e Evaporation) Check() error { return e.check() }

func (e *Evaporation) check() error {
	if err := e.Convection.check(); err != nil {
		return err
	}
	if !(e.VapourPressure.SI() >= 0 && e.VapourPressure.SI() < e.Convection.pressure().SI()) {
		return &units.ArgumentError{Field: "evaporation: vapour pressure", Value: e.VapourPressure, Accepted: "from 0 to below the pressure of the air, " + e.Convection.pressure().String()}
	}
	return nil
}

// Flux returns the heat flux that the vapour takes from the surface, negative where it condenses. It does not depend on t.
// It returns the errors of [Evaporation.Check] and of [Convection.Film], a [*units.RangeError] for a wall below
// −20 °C or at the boiling point or above, and for a film above 400 K, where the diffusivity ends, and an [*units.ArgumentError] for a fluid that is no gas.
func (e Evaporation) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	var r rate
	if err := e.rate(&r, wall); err != nil {
		return units.HeatFlux{}, err
	}
	x := r.mass * vapourHeat / r.h
	kept := -x / 2 // of x/(e^x − 1) − 1, the limit of small x
	if math.Abs(x) > 1e-6 {
		kept = x/math.Expm1(x) - 1
	}
	return finite("evaporation: flux", r.mass*latentHeat(wall.SI())+kept*r.h*(wall.SI()-e.Convection.Ambient.SI()))
}

// MassFlux returns the water that leaves the surface, negative where vapour condenses. Its errors are those of Flux.
func (e Evaporation) MassFlux(wall units.Temperature) (units.MassFlux, error) {
	var r rate
	if err := e.rate(&r, wall); err != nil {
		return units.MassFlux{}, err
	}
	return units.KilogramPerSquareMetreSecond.Of(r.mass), nil
}

// rate is how fast a surface gives off vapour.
type rate struct {
	h    float64 // of the dry body, W/(m² K)
	mass float64 // kg/(m² s)
}

func (e *Evaporation) rate(r *rate, wall units.Temperature) error {
	if err := e.check(); err != nil {
		return err
	}
	if err := units.CheckTemperature("evaporation: wall", wall); err != nil {
		return err
	}
	p := e.Convection.pressure().SI()
	saturation := property.VapourSaturation(min(wall.SI(), 600))
	if !(wall.SI() >= coldestWet && saturation < p) {
		return &units.RangeError{
			Model: wetBodyModel, Quantity: "temperature of the wall", Value: wall.Dynamic(),
			Min: units.Kelvin.Of(coldestWet).Dynamic(), Max: units.Kelvin.Of(property.WaterBoiling(p)).Dynamic(), Source: wetAdvice,
		}
	}
	var f Film
	var s surroundings
	if err := e.Convection.film(&f, &s, wall); err != nil {
		return err
	}
	if !s.film.gas {
		return &units.ArgumentError{Field: "evaporation: fluid", Value: e.Convection.Fluid.Name(), Accepted: "air, such as props.Air()"}
	}
	diffusivity, err := props.VapourDiffusivity(f.Temperature, units.Pascal.Of(p))
	if err != nil {
		return err
	}
	r.h = f.Coefficient.SI()
	atWall := massFraction(saturation / p)
	drive := math.Log1p((atWall - massFraction(e.VapourPressure.SI()/p)) / (1 - atWall))
	diffusion := s.film.nu / s.film.pr
	r.mass = r.h / s.film.specificHeat * pow.Of(diffusion/diffusivity.SI(), -lewisPower) * drive * (1 + float64(e.limit)*analogyScatter)
	if e.CondensesOnly {
		r.mass = min(r.mass, 0)
	}
	return units.CheckFinite("evaporation: mass flux", units.KilogramPerSquareMetreSecond.Of(r.mass))
}

// massFraction returns the mass of vapour to that of the mixture, for its share of the moles.
func massFraction(x float64) float64 {
	return property.MolarMassRatio * x / (1 - x + property.MolarMassRatio*x)
}

// latentHeat returns the heat of evaporation in J/kg at a temperature in K, below the triple point that of
// sublimation. The first is our own fit to IAPWS R7-97(2012), 0 °C to 125 °C, within 3e-5; the second has the value and the
// slope of IAPWS R10-06(2009) at 0 °C and our own curvature, within 0.1 % to −20 °C.
func latentHeat(T float64) float64 {
	t := T - 273.15
	if T < triplePoint {
		return 2834.35e3 - (238+3.7*t)*t
	}
	return 2500.958e3 - (2379.778-(0.6679213-0.0132195*t)*t)*t
}

// In returns the same surface in air of another temperature, with the same vapour pressure.
func (e Evaporation) In(ambient units.Temperature) Part {
	e.Convection.Ambient = ambient
	return e
}

// Low returns the same evaporation with the convection at the lower limit of its scatter, and 10 % less for the analogy.
func (e Evaporation) Low() Part { return e.at(-1) }

// High returns the same evaporation with the convection at the upper limit of its scatter, and 10 % more for the analogy.
func (e Evaporation) High() Part { return e.at(+1) }

func (e Evaporation) at(l limit) Part {
	e.limit, e.Convection.limit = l, l
	return e
}

// Sources returns those of the convection and of the analogy.
func (e Evaporation) Sources() []string {
	return append(e.Convection.Sources(), "evaporation: "+AnalogySource)
}

// Notes returns the assumptions.
func (e Evaporation) Notes() []string {
	list := append(e.Convection.Notes(), "evaporation: the whole surface is wet, with the vapour pressure of pure water; buoyancy by the vapour is left out; properties of the film as those of the fluid of the convection")
	if e.CondensesOnly {
		list = append(list, "evaporation: condensation only, nothing evaporates")
	}
	return append(list, e.limit.notes("evaporation")...)
}

// Warnings returns those of the convection.
func (e Evaporation) Warnings() []string { return e.Convection.Warnings() }
