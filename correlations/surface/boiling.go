package surface

import (
	"fmt"
	"math"

	"example.com/coolward/correlations"
	"example.com/coolward/internal/physics"
	"example.com/coolward/internal/property"
	"example.com/coolward/props"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// BoilingSource is where a [BoilingCurve] comes from.
const BoilingSource = "pool boiling of water: W. M. Rohsenow, Trans. ASME 74 (1952) 969-976; greatest flux: N. Zuber (1958), with the sizes of K. H. Sun and J. H. Lienhard (1970) and of J. H. Lienhard and V. K. Dhir (1973), " +
	"and the subcooling of H. J. Ivey and D. J. Morris (1962); least film: P. J. Berenson, J. Heat Transfer 83 (1961) 351-358; radiation through the film: L. A. Bromley, Chem. Eng. Prog. 46 (1950) 221-227 (all from memory, the last read on a page; the numbers reproduce worked examples)"

// BoilingScatter is how far a measured flux may lie from a [BoilingCurve] where nobody has measured the very surface, common
// practice, no source. Rohsenow's is uncertain by a factor of two in the flux.
const BoilingScatter = 0.50

const (
	usualNucleation = 0.013 // Csf
	boilingLow      = 50e3  // Pa
	boilingHigh     = 140e3
	zuber           = 0.131
	boilingModel    = "pool boiling of water"
	boilingDanger   = "boiling: water spits and scalds when something hot goes in, and quench oils burn and, wet, explode; follow the local codes and leave quenching to people with the licence and the gear"
)

// Boiling is a hot body in a pool of water at rest near atmospheric pressure: quenching. [Boiling.Curve] works out the curve of
// its flux over the temperature of its surface.
type Boiling struct {
	Body     shape.Body
	Position Position     // as in [Convection]
	Length   units.Length // as in [Convection]

	Water    units.Temperature // of the pool, from 4 °C, below which its density turns, to boiling
	Pressure units.Pressure    // 50 kPa to 140 kPa; 0 means 101 325 Pa

	// Nucleation is Rohsenow's constant of the surface, 0 means 0.013: 0.0128 for polished copper, 0.0068 for scored, 0.006 for brass and nickel,
	// 0.008 to 0.013 for stainless steel (from memory). The flux of nucleate boiling goes with its power −3.
	Nucleation float64

	Emissivity float64 // of the hot surface, above 0, to 1, for radiation through the film of vapour
}

// A BoilingRegion is a part of the curve.
type BoilingRegion uint8

// The regions, by rising temperature of the wall.
const (
	LiquidConvection  BoilingRegion = iota + 1 // natural convection of the water outweighs bubbles
	NucleateBoiling                            // bubbles
	TransitionBoiling                          // bubbles and patches of film: the flux falls as the wall gets hotter
	FilmBoiling                                // a film of vapour
)

// String returns liquid, nucleate, transition or film.
func (r BoilingRegion) String() string {
	switch r {
	case LiquidConvection:
		return "liquid"
	case NucleateBoiling:
		return "nucleate"
	case TransitionBoiling:
		return "transition"
	case FilmBoiling:
		return "film"
	}
	return "no region"
}

// A BoilingPoint is a turning point of a curve.
type BoilingPoint struct {
	Wall units.Temperature
	Flux units.HeatFlux
}

// A BoilingCurve is the heat flux of a body in boiling water over the temperature of its surface, a [Part]. It is one continuous curve:
//
//   - natural convection of the water, whose properties stay as at boiling above it, and Rohsenow's nucleate boiling, joined by their cubes;
//   - to the greatest flux by Zuber;
//   - a straight line in the logarithms of flux and superheat, from there to the least superheat of a film by Berenson;
//   - the film by Bromley for balls and level cylinders and by Berenson for any other body, with radiation through it, and with the natural convection
//     of the water where the pool is colder than boiling.
//
// It is immutable.
type BoilingCurve struct {
	boiling     Boiling
	liquid      Convection
	saturation  float64 // K
	p           units.Pressure
	heat        float64 // of evaporation, J/kg
	liquidDense float64
	bubbles     float64 // flux over the third power of the superheat, W/(m² K³)
	film        correlations.Correlation
	length      float64 // of the film, m
	share       float64 // of the sensible heat of the vapour
	subcooled   float64 // flux of the water around a film, W/m²
	peak, least BoilingPoint
	berenson    float64 // least flux by Berenson, W/m²
	limit       limit
}

// coldLiquid is water whose properties stay as they are at a temperature above it, so that natural convection goes on where the
// water would boil.
type coldLiquid struct {
	props.Fluid
	most units.Temperature
}

func (l coldLiquid) At(T units.Temperature, p units.Pressure) (props.FluidState, error) {
	if T.Compare(l.most) > 0 {
		T = l.most
	}
	return l.Fluid.At(T, p)
}

// Curve returns the curve. It returns an [*units.ArgumentError] for a field that cannot be, and a [*units.RangeError] for a pressure or a size outside the
// ranges of the formulas, and for a pool outside those of water.
func (b Boiling) Curve() (*BoilingCurve, error) {
	if !(b.Emissivity > 0 && b.Emissivity <= 1) {
		return nil, &units.ArgumentError{Field: "boiling: emissivity", Value: b.Emissivity, Accepted: "above 0, to 1"}
	}
	if b.Nucleation == 0 {
		b.Nucleation = usualNucleation
	}
	if err := units.CheckNumber("boiling: nucleation", b.Nucleation, 0.002, 0.05); err != nil {
		return nil, err
	}
	if b.Pressure.SI() == 0 {
		b.Pressure = units.Pascal.Of(standardPressure)
	}
	if !(b.Pressure.SI() >= boilingLow && b.Pressure.SI() <= boilingHigh) {
		if err := units.CheckPositive("boiling: pressure", b.Pressure); err != nil {
			return nil, err
		}
		return nil, &units.RangeError{
			Model: boilingModel, Quantity: "pressure", Value: b.Pressure.Dynamic(),
			Min: units.Pascal.Of(boilingLow).Dynamic(), Max: units.Pascal.Of(boilingHigh).Dynamic(), Source: "near atmospheric, own choice",
		}
	}
	boils, err := props.SaturationTemperature(b.Pressure)
	if err != nil {
		return nil, err
	}
	if err = within(boilingModel, "temperature of the pool", b.Water, 273.15, boils.SI(), "liquid water"); err != nil {
		return nil, err
	}
	c := &BoilingCurve{boiling: b, saturation: boils.SI()}
	if c.p, err = props.SaturationPressure(boils); err != nil {
		return nil, err
	}
	return c, c.build()
}

// build works out the constants and the turning points of the curve.
func (c *BoilingCurve) build() error {
	b := &c.boiling
	boils := units.Kelvin.Of(c.saturation)
	water, err := props.Water().At(boils, c.p)
	if err != nil {
		return err
	}
	vapour, err := props.Steam().At(boils, c.p)
	if err != nil {
		return err
	}
	heat, err := props.EvaporationHeat(boils)
	if err != nil {
		return err
	}
	tension := property.WaterSurfaceTension(c.saturation)
	c.heat, c.liquidDense = heat.SI(), water.Density.SI()
	lift := standardGravity * (c.liquidDense - vapour.Density.SI())
	taylor := math.Sqrt(tension / lift)

	c.liquid = Convection{
		Body: b.Body, Position: b.Position, Length: b.Length, Ambient: b.Water, Pressure: c.p,
		Fluid: coldLiquid{props.Water(), units.Kelvin.Of(c.saturation/2 + b.Water.SI()/2)},
	}
	if err = c.liquid.check(); err != nil {
		return err
	}
	if b.Water.SI() < c.saturation {
		q, err := c.liquid.Flux(units.Duration{}, boils)
		if err != nil {
			return err
		}
		c.subcooled = q.SI()
	}

	// Rohsenow, with the exponent 1 of the Prandtl number of water.
	x := water.SpecificHeat.SI() / (b.Nucleation * c.heat * water.Prandtl())
	c.bubbles = water.Viscosity.SI() * c.heat / taylor * x * x * x

	size, err := c.choose(taylor)
	if err != nil {
		return err
	}
	ratio := c.liquidDense / vapour.Density.SI()
	greatest := zuber * size * c.heat * math.Sqrt(vapour.Density.SI()) * math.Sqrt(math.Sqrt(tension*lift))
	greatest *= 1 + 0.1*math.Sqrt(ratio*math.Sqrt(ratio))*water.SpecificHeat.SI()*(c.saturation-b.Water.SI())/c.heat
	superheat := math.Cbrt(greatest / c.bubbles)
	q, err := c.boils(superheat)
	if err != nil {
		return err
	}
	c.peak = BoilingPoint{units.Kelvin.Of(c.saturation + superheat), units.WattPerSquareMetre.Of(q)}

	least, err := c.leastSuperheat(lift, taylor)
	if err != nil {
		return err
	}
	if !(least > 1.1*superheat) {
		return &units.ArgumentError{Field: "boiling: nucleation", Value: b.Nucleation, Accepted: fmt.Sprintf("a surface whose greatest flux is at a superheat well below the %.3g K at which the film begins", least)}
	}
	if q, err = c.filmFlux(least); err != nil {
		return err
	}
	c.least = BoilingPoint{units.Kelvin.Of(c.saturation + least), units.WattPerSquareMetre.Of(q)}
	both := c.liquidDense + vapour.Density.SI()
	c.berenson = 0.09 * vapour.Density.SI() * c.heat * math.Sqrt(math.Sqrt(tension*lift/(both*both)))
	if !(c.peak.Flux.SI() > c.least.Flux.SI()) {
		return &units.ArgumentError{Field: "boiling: body", Value: b.Body.String(), Accepted: "a body whose film takes less heat than its bubbles"}
	}
	return nil
}

// choose sets the correlation of the film, and returns the factor of the greatest flux by the size of the body.
func (c *BoilingCurve) choose(taylor float64) (size float64, err error) {
	radius := c.boiling.Body.Diameter().SI() / 2
	relative := radius / taylor
	form := c.liquid.form()
	c.share = 0.80
	c.length = 2 * radius
	switch form {
	case ballForm:
		c.film = correlations.BromleySphere()
		size = 0.84
		if relative < 4.26 {
			size = 1.734 / math.Sqrt(relative)
		}
	case levelCylinder:
		c.film = correlations.BromleyCylinder()
		size = 0.89 + 2.27*math.Exp(-3.44*math.Sqrt(relative))
	default:
		c.film, c.length, c.share = correlations.BerensonPlate(), taylor, 0.5
		return 1, nil
	}
	if relative < 0.15 {
		return 0, &units.RangeError{
			Model: boilingModel + ", greatest flux", Quantity: "radius over (σ/(g Δρ))^(1/2)", Value: units.Number(relative),
			Min: units.Number(0.15), Max: units.Number(math.Inf(1)), Source: BoilingSource,
		}
	}
	return size, nil
}

// leastSuperheat is Berenson's, with the vapour at the mean of wall and boiling, found by repetition.
func (c *BoilingCurve) leastSuperheat(lift, taylor float64) (float64, error) {
	least := 70.0
	for range 8 {
		s, err := c.vapour(least)
		if err != nil {
			return 0, err
		}
		dense := s.Density.SI()
		x := lift / (c.liquidDense + dense)
		least = 0.127 * dense * c.heat / s.Conductivity.SI() * math.Cbrt(x*x) * taylor * math.Cbrt(s.Viscosity.SI()/lift)
	}
	return least, nil
}

// vapour returns the steam of the film.
func (c *BoilingCurve) vapour(superheat float64) (props.FluidState, error) {
	return props.Steam().At(units.Kelvin.Of(c.saturation+superheat/2), c.p)
}

// boils returns the flux of natural convection and bubbles.
func (c *BoilingCurve) boils(superheat float64) (float64, error) {
	q, err := c.liquid.Flux(units.Duration{}, units.Kelvin.Of(c.saturation+superheat))
	if err != nil || superheat <= 0 {
		return q.SI(), err
	}
	n, r := q.SI(), c.bubbles*superheat*superheat*superheat
	return math.Cbrt(n*n*n + r*r*r), nil
}

// filmFlux returns the flux through a film, with that of the cold water around it.
func (c *BoilingCurve) filmFlux(superheat float64) (float64, error) {
	s, err := c.vapour(superheat)
	if err != nil {
		return 0, err
	}
	dense, k := s.Density.SI(), s.Conductivity.SI()
	heat := c.heat + c.share*s.SpecificHeat.SI()*superheat
	number := standardGravity * dense * (c.liquidDense - dense) * heat * c.length * c.length * c.length / (s.Viscosity.SI() * k * superheat)
	r, err := c.film.Nu(correlations.Groups{FilmRa: number})
	if err != nil {
		return 0, err
	}
	T := c.saturation + superheat
	convection := r.Nu * k / c.length
	radiation := c.boiling.Emissivity * physics.StefanBoltzmann * (T*T + c.saturation*c.saturation) * (T + c.saturation)
	return withRadiation(convection, radiation)*superheat + c.subcooled, nil
}

// withRadiation returns the coefficient h of a film through which heat is radiated, h^(4/3) = hc^(4/3) + hr h^(1/3).
func withRadiation(convection, radiation float64) float64 {
	known := convection * math.Cbrt(convection)
	y := math.Cbrt(convection + radiation) // above the root of y⁴ − hr y − hc^(4/3), from where Newton's method falls steadily
	for range 20 {
		next := y - (y*y*y*y-radiation*y-known)/(4*y*y*y-radiation)
		if !(next < y) {
			break
		}
		y = next
	}
	return y * y * y
}

// Region returns the region of the curve in which the wall is.
func (c *BoilingCurve) Region(wall units.Temperature) (BoilingRegion, error) {
	if err := c.usable(wall); err != nil {
		return 0, err
	}
	superheat := wall.SI() - c.saturation
	switch {
	case wall.Compare(c.least.Wall) >= 0:
		return FilmBoiling, nil
	case wall.Compare(c.peak.Wall) > 0:
		return TransitionBoiling, nil
	case superheat <= 0:
		return LiquidConvection, nil
	}
	q, err := c.liquid.Flux(units.Duration{}, wall)
	if err != nil {
		return 0, err
	}
	if q.SI() > c.bubbles*superheat*superheat*superheat {
		return LiquidConvection, nil
	}
	return NucleateBoiling, nil
}

func (c *BoilingCurve) usable(wall units.Temperature) error {
	if err := c.Check(); err != nil {
		return err
	}
	return units.CheckTemperature("boiling: wall", wall)
}

// Boils returns the temperature at which the water boils; 0 K of no curve.
func (c *BoilingCurve) Boils() units.Temperature {
	if c == nil {
		return units.Temperature{}
	}
	return units.Kelvin.Of(c.saturation)
}

// Peak returns the greatest flux, the critical heat flux; zero of no curve.
func (c *BoilingCurve) Peak() BoilingPoint {
	if c == nil {
		return BoilingPoint{}
	}
	return c.scaled(c.peak)
}

// Least returns the least flux of a film, the point of Leidenfrost; zero of no curve.
func (c *BoilingCurve) Least() BoilingPoint {
	if c == nil {
		return BoilingPoint{}
	}
	return c.scaled(c.least)
}

func (c *BoilingCurve) scaled(p BoilingPoint) BoilingPoint {
	p.Flux = p.Flux.Scale(1 + float64(c.limit)*BoilingScatter)
	return p
}

// Name returns "boiling".
func (c *BoilingCurve) Name() string { return "boiling" }

// Check returns an [*units.ArgumentError] for a curve that [Boiling.Curve] did not make.
func (c *BoilingCurve) Check() error {
	if c == nil || c.saturation == 0 {
		return &units.ArgumentError{Field: "boiling: curve", Accepted: "one from surface.Boiling.Curve"}
	}
	return nil
}

// Flux returns the flux at the temperature of the wall, positive out of the body. It does not depend on t. It returns the errors of [BoilingCurve.Check] and of
// [Convection.Film] for the water, a [*units.RangeError] where the film is hotter than steam is known for, at a wall near 1500 °C, and an
// [*units.ArgumentError] for a wall that is not above 0 K.
func (c *BoilingCurve) Flux(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
	if err := c.usable(wall); err != nil {
		return units.HeatFlux{}, err
	}
	q, err := c.flux(wall)
	if err != nil {
		return units.HeatFlux{}, err
	}
	return finite("boiling: flux", q*(1+float64(c.limit)*BoilingScatter))
}

func (c *BoilingCurve) flux(wall units.Temperature) (float64, error) {
	superheat := wall.SI() - c.saturation
	low, high := c.peak.Wall.SI()-c.saturation, c.least.Wall.SI()-c.saturation
	switch {
	case superheat <= low:
		return c.boils(superheat)
	case superheat < high:
		slope := math.Log(c.least.Flux.SI()/c.peak.Flux.SI()) / math.Log(high/low)
		return c.peak.Flux.SI() * math.Pow(superheat/low, slope), nil
	}
	return c.filmFlux(superheat)
}

// Low returns the curve with half the flux everywhere.
func (c *BoilingCurve) Low() Part { return c.at(-1) }

// High returns the curve with half as much flux again everywhere.
func (c *BoilingCurve) High() Part { return c.at(+1) }

func (c *BoilingCurve) at(l limit) Part {
	if c.Check() != nil {
		return c
	}
	end := *c
	end.limit = l
	return &end
}

// Sources returns those of the curve and of the water.
func (c *BoilingCurve) Sources() []string {
	if c.Check() != nil {
		return nil
	}
	return append([]string{BoilingSource, c.film.Source(), props.Steam().Name() + ": " + props.Steam().Source()}, c.liquid.Sources()...)
}

// Notes returns the assumptions, and how the least flux compares with that of Berenson.
func (c *BoilingCurve) Notes() []string {
	if c.Check() != nil {
		return nil
	}
	list := []string{
		"boiling: clean water at rest, a surface of one temperature, one continuous curve of natural convection, nucleate, transition and film boiling",
		fmt.Sprintf("boiling: the film begins with %.3g kW/m² by its own formula, %.3g kW/m² by Berenson", c.least.Flux.SI()/1e3, c.berenson/1e3),
	}
	return append(list, c.limit.notes("boiling")...)
}

// Warnings returns what a reader must know before using a number from this curve.
func (c *BoilingCurve) Warnings() []string {
	return []string{
		"boiling: the flux is known to ±50 % at best; where the film breaks down depends on the surface and on the cold of the water, and water has been seen to wet at 193 °C as well",
		boilingDanger,
	}
}
