package lumped

import (
	"context"
	"math"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/derivation"
	"example.com/coolward/units/shape"
)

// A Sensor measures the temperature of a medium and is late: it is at one temperature of its own, or, in a
// sheath, at two. Make one with [BareSensor], [SensorWith] or [SheathedSensor]. What it shows is the temperature
// of its element; no heat passes along its leads.
type Sensor struct {
	element units.HeatCapacity
	contact units.Conductance // from the element to the medium, or to the sheath
	sheath  units.HeatCapacity
	film    units.Conductance // from the sheath to the medium

	body         shape.Body // of a bare sensor
	density      units.Density
	specificHeat units.SpecificHeat
	coefficient  units.HeatTransferCoefficient
}

// BareSensor returns the sensor that is a body in the medium, such as the bead of a thermocouple, with the heat
// transfer coefficient of the flow around it. Its time constant is ρ c (V/A)/h.
func BareSensor(body shape.Body, density units.Density, specificHeat units.SpecificHeat, h units.HeatTransferCoefficient) (Sensor, error) {
	if err := body.Check(); err != nil {
		return Sensor{}, err
	}
	for _, err := range []error{
		units.CheckPositive("sensor: density", density),
		units.CheckPositive("sensor: specific heat", specificHeat),
		units.CheckPositive("sensor: heat transfer coefficient", h),
	} {
		if err != nil {
			return Sensor{}, err
		}
	}
	s := Sensor{
		element: units.HeatCapacityOf(density, specificHeat, body.Volume()), contact: units.ConductanceOf(h, body.Area()),
		body: body, density: density, specificHeat: specificHeat, coefficient: h,
	}
	return s, s.Check()
}

// SensorWith returns the sensor of one temperature with a time constant that is known, from a data sheet for
// the same flow or from a test.
func SensorWith(timeConstant units.Duration) (Sensor, error) {
	if err := units.CheckPositive("sensor: time constant", timeConstant); err != nil {
		return Sensor{}, err
	}
	s := Sensor{element: units.JoulePerKelvin.Of(timeConstant.SI()), contact: units.WattPerKelvin.Of(1)}
	return s, s.Check()
}

// SheathedSensor returns the sensor whose element passes heat to a sheath by the conductance contact, and the
// sheath to the medium by the conductance film, the coefficient of the flow times the area of the
// sheath.
func SheathedSensor(element units.HeatCapacity, contact units.Conductance, sheath units.HeatCapacity, film units.Conductance) (Sensor, error) {
	s := Sensor{element: element, contact: contact, sheath: sheath, film: film}
	for _, err := range []error{
		units.CheckPositive("sensor: heat capacity of the element", element),
		units.CheckPositive("sensor: conductance to the sheath", contact),
		units.CheckPositive("sensor: heat capacity of the sheath", sheath),
		units.CheckPositive("sensor: conductance to the medium", film),
	} {
		if err != nil {
			return Sensor{}, err
		}
	}
	return s, s.Check()
}

// Check returns an [*units.ArgumentError] for the zero Sensor, and for one whose time constants are not finite
// and above 0.
func (s Sensor) Check() error {
	if s == (Sensor{}) {
		return &units.ArgumentError{Field: "sensor", Accepted: "one that BareSensor, SensorWith or SheathedSensor returned"}
	}
	lag, square := s.lags()
	if err := units.CheckPositive("sensor: time constant", units.Second.Of(lag)); err != nil {
		return err
	}
	if s.sheathed() && !(square > 0 && isFinite(square)) {
		return &units.ArgumentError{Field: "sensor: time constants", Accepted: "finite and above 0 s"}
	}
	return nil
}

func (s Sensor) sheathed() bool { return s.sheath.SI() > 0 }

// lags returns the sum and the product of the two time constants: the element follows the medium u as u = T + sum
// T' + product T”.
func (s Sensor) lags() (sum, product float64) {
	first := s.element.SI() / s.contact.SI()
	if !s.sheathed() {
		return first, 0
	}
	second := s.sheath.SI() / s.film.SI()
	return first + second + s.element.SI()/s.film.SI(), first * second
}

// TimeConstants returns the time constants, the longest first: one, or two for a sensor in a sheath.
func (s Sensor) TimeConstants() []units.Duration {
	if s.Check() != nil {
		return nil
	}
	sum, product := s.lags()
	if !s.sheathed() {
		return []units.Duration{units.Second.Of(sum)}
	}
	long := (sum + math.Sqrt(sum)*math.Sqrt(max(sum-4*(product/sum), 0))) / 2
	return []units.Duration{units.Second.Of(long), units.Second.Of(product / long)}
}

// Lag returns how late the sensor shows a temperature that rises at a constant rate, once it has risen for long: the
// sum of the time constants. It shows that much times the rate too little.
func (s Sensor) Lag() units.Duration {
	if s.Check() != nil {
		return units.Duration{}
	}
	sum, _ := s.lags()
	return units.Second.Of(sum)
}

// ResponseTime returns when the sensor shows a part of a sudden step of the medium, between 0 and 1: 1 − 1/e,
// that is 63.2 %, after one time constant if it has no sheath, and 90 % are common.
func (s Sensor) ResponseTime(part float64) (units.Duration, error) {
	if err := s.Check(); err != nil {
		return units.Duration{}, err
	}
	if !(part > 0 && part < 1) {
		return units.Duration{}, &units.ArgumentError{Field: "part of the step", Value: part, Accepted: "above 0 and below 1"}
	}
	if !s.sheathed() {
		return s.Lag().Scale(-math.Log1p(-part)), nil
	}
	step, err := s.Follow(boundary.Steady(units.Kelvin.Of(2)), units.Kelvin.Of(1), units.Duration{})
	if err != nil {
		return units.Duration{}, err
	}
	return step.TimeTo(Element, units.Kelvin.Of(1+part))
}

// The names of the nodes of a sensor in what [Sensor.Follow] returns.
const (
	Element = "element"
	Sheath  = "sheath"
)

// Follow returns what the sensor shows while the medium takes its course, from time 0, at which all of the sensor is
// at start: the temperature of the node [Element]. The horizon is needed unless the medium is
// [boundary.Steady], which is a step.
func (s Sensor) Follow(medium boundary.Course, start units.Temperature, horizon units.Duration) (*NetworkSolution, error) {
	if err := s.Check(); err != nil {
		return nil, err
	}
	const around = "medium"
	n := Network{
		Nodes:        []Node{{Name: Element, Capacity: s.element, Initial: start}},
		Surroundings: []Surroundings{{around, medium}},
		Links:        []Link{{From: Element, To: around, Conductance: s.contact}},
		Horizon:      horizon,
	}
	if s.sheathed() {
		n.Nodes = append(n.Nodes, Node{Name: Sheath, Capacity: s.sheath, Initial: start})
		n.Links = []Link{{From: Element, To: Sheath, Conductance: s.contact}, {From: Sheath, To: around, Conductance: s.film}}
	}
	return n.Solve(context.Background())
}

// Derivation returns how the time constants were obtained. It is the caller's own copy.
func (s Sensor) Derivation() derivation.Record {
	var r derivation.Record
	if s.Check() != nil {
		return r
	}
	r.Title = "Lag of a sensor"
	switch {
	case s.body != (shape.Body{}):
		r.Title += ", bare: " + s.body.String()
		r.Add("V/A", "length of lumped analysis", s.body.VolumeToArea(), "V / A")
		r.Add("ρ", "density", s.density, "given")
		r.Add("c", "specific heat", s.specificHeat, "given")
		r.Add("h", "heat transfer coefficient", s.coefficient, "given")
		r.Add("τ", "time constant", s.Lag(), "ρ c (V/A) / h")
	case s.sheathed():
		r.Title += " in a sheath"
		r.Add("C1", "heat capacity of the element", s.element, "given")
		r.Add("G1", "conductance to the sheath", s.contact, "given")
		r.Add("C2", "heat capacity of the sheath", s.sheath, "given")
		r.Add("G2", "conductance to the medium", s.film, "given")
		for i, tau := range s.TimeConstants() {
			r.Add([]string{"τ1", "τ2"}[i], "time constant", tau, "τ1 + τ2 = C1/G1 + C1/G2 + C2/G2, τ1 τ2 = C1 C2/(G1 G2)")
		}
		r.Add("lag", "lag behind a steady rise", s.Lag(), "τ1 + τ2")
	default:
		r.Add("τ", "time constant", s.Lag(), "given")
	}
	r.Note("no heat along the leads, and no radiation to other surroundings than the medium")
	return r
}
