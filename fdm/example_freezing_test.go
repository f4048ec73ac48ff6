package fdm_test

import (
	"context"
	"fmt"
	"log"

	"example.com/coolward/fdm"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// rinkWater is water that stands still, with ice of the same density: constant properties on both sides of 0 °C, where the
// enthalpy jumps by the latent heat. 0 °C is a kink, at which a property is that of the water.
type rinkWater struct{}

const (
	latent      = 333_600 // J/kg
	iceHeat     = 2050    // J/(kg K)
	waterHeat   = 4200
	ofIce       = 2.22 // W/(m K)
	ofWater     = 0.57
	rinkDensity = 917 // kg/m³
)

func (rinkWater) Density() units.Density { return units.KilogramPerCubicMetre.Of(rinkDensity) }

func (rinkWater) Conductivity(T units.Temperature) (units.Conductivity, error) {
	if T.In(units.Celsius) < 0 {
		return units.WattPerMetreKelvin.Of(ofIce), nil
	}
	return units.WattPerMetreKelvin.Of(ofWater), nil
}

func (rinkWater) SpecificHeat(T units.Temperature) (units.SpecificHeat, error) {
	if T.In(units.Celsius) < 0 {
		return units.JoulePerKilogramKelvin.Of(iceHeat), nil
	}
	return units.JoulePerKilogramKelvin.Of(waterHeat), nil
}

func (rinkWater) Enthalpy(T units.Temperature) (units.SpecificEnergy, error) {
	t := T.In(units.Celsius)
	if t < 0 {
		return units.JoulePerKilogram.Of(iceHeat * t), nil
	}
	return units.JoulePerKilogram.Of(latent + waterHeat*t), nil
}

func (rinkWater) Temperature(h units.SpecificEnergy) (units.Temperature, error) {
	switch x := h.SI(); {
	case x < 0:
		return units.Celsius.Of(x / iceHeat), nil
	case x > latent:
		return units.Celsius.Of((x - latent) / waterHeat), nil
	}
	return units.Celsius.Of(0), nil
}

func (rinkWater) Range() (low, high units.Temperature) {
	return units.Celsius.Of(-40), units.Celsius.Of(40)
}

func (rinkWater) Kinks() []units.Temperature { return []units.Temperature{units.Celsius.Of(0)} }

// A floor that is kept at −9 °C is flooded 30 mm deep with water of 6 °C, under air of 4 °C. How thick is the ice, and when
// is the last of the water frozen? The surface of the body is its face on the floor.
func ExampleSolution_Front() {
	sheet := fdm.Problem{
		Body:     shape.Plate(units.Millimetre.Of(30), units.SquareMetre.Of(1)).Exposing(shape.Front),
		Material: rinkWater{},
		Initial:  units.Celsius.Of(6),
		Surface:  boundary.Temperature(units.Celsius.Of(-9)),
		Opposite: boundary.Constant(units.WattPerSquareMetreKelvin.Of(6), units.Celsius.Of(4)),
		Horizon:  units.Hour.Of(6),
		Cells:    200,
	}
	solution, err := sheet.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	melting := units.Celsius.Of(0)
	for _, after := range []units.Duration{units.Minute.Of(20), units.Hour.Of(1)} {
		fronts, err := solution.Front(melting, after)
		if err != nil {
			log.Fatal(err)
		}
		for _, depth := range fronts {
			fmt.Println("after", after, "ice of", depth.Text(units.Millimetre, 3))
		}
	}
	frozen, err := solution.TimeTo(shape.Slowest(), units.Celsius.Of(-0.1))
	if err != nil {
		log.Fatal(err)
	}
	fmt.Println("all of it after", frozen.Text(units.Hour, 3))

	// Output:
	// after 20 min ice of 11.6 mm
	// after 1 h ice of 20.6 mm
	// all of it after 2.06 h
}
