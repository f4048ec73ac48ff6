package fdm_test

import (
	"context"
	"errors"
	"fmt"
	"log"
	"math"

	"example.com/coolward/fdm"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// millSteel is the steel of a grinding ball as its mill certifies it: c and k in straight lines between
// 0 °C and 900 °C.
type millSteel struct{}

func (millSteel) Density() units.Density { return units.KilogramPerCubicMetre.Of(7800) }

func (millSteel) Conductivity(T units.Temperature) (units.Conductivity, error) {
	return units.WattPerMetreKelvin.Of(48 - 0.025*T.In(units.Celsius)), nil
}

func (millSteel) SpecificHeat(T units.Temperature) (units.SpecificHeat, error) {
	return units.JoulePerKilogramKelvin.Of(450 + 0.4*T.In(units.Celsius)), nil
}

func (millSteel) Enthalpy(T units.Temperature) (units.SpecificEnergy, error) {
	t := T.In(units.Celsius)
	return units.JoulePerKilogram.Of(450*t + 0.2*t*t), nil
}

func (millSteel) Temperature(h units.SpecificEnergy) (units.Temperature, error) {
	return units.Celsius.Of((math.Sqrt(450*450+0.8*h.SI()) - 450) / 0.4), nil
}

func (millSteel) Range() (low, high units.Temperature) {
	return units.Celsius.Of(0), units.Celsius.Of(900)
}

func (millSteel) Kinks() []units.Temperature { return nil }

// A forged grinding ball leaves the roll at 850 °C and cools on a conveyor in moving air of 35 °C, by
// convection and radiation. When may it drop into the bin, where nothing hotter than 120 °C may go?
func ExampleProblem_Solve() {
	air := units.Celsius.Of(35)
	loss := func(t units.Duration, wall units.Temperature) (units.HeatFlux, error) {
		const h, emissivity, sigma = 32, 0.75, 5.670374419e-8
		T, T0 := wall.SI(), air.SI()
		return units.WattPerSquareMetre.Of(h*(T-T0) + emissivity*sigma*(T*T*T*T-T0*T0*T0*T0)), nil
	}
	ball := fdm.Problem{
		Body:     shape.Sphere(units.Millimetre.Of(80)),
		Material: millSteel{},
		Initial:  units.Celsius.Of(850),
		Surface:  boundary.Function(loss),
		Horizon:  units.Hour.Of(3),
		Sources:  []string{"properties: mill certificate of the ball"},
	}
	solution, err := ball.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	wait, err := solution.TimeTo(shape.Centre(), units.Celsius.Of(120))
	if err != nil {
		log.Fatal(err)
	}
	skin, err := solution.At(shape.Surface(), wait)
	if err != nil {
		log.Fatal(err)
	}
	heat, err := solution.HeatReleased(wait)
	if err != nil {
		log.Fatal(err)
	}
	fmt.Println("into the bin after", wait.Text(units.Minute, 4))
	fmt.Println("skin at", skin.Text(units.Celsius, 1))
	fmt.Println("heat to carry off", heat.Text(units.Megajoule, 3))

	// Output:
	// into the bin after 44.78 min
	// skin at 118.5 °C
	// heat to carry off 0.984 MJ
}

// The same question for a temperature that the ball never reaches, with the answer that tells.
func ExampleSolution_TimeTo() {
	ball := fdm.Problem{
		Body:     shape.Sphere(units.Millimetre.Of(80)),
		Material: millSteel{},
		Initial:  units.Celsius.Of(850),
		Surface:  boundary.Constant(units.WattPerSquareMetreKelvin.Of(60), units.Celsius.Of(35)),
		Horizon:  units.Hour.Of(1),
	}
	solution, err := ball.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	for _, target := range []float64{200, 36, 30} {
		wait, err := solution.TimeTo(shape.Centre(), units.Celsius.Of(target))
		var never *units.NeverError
		var later *units.HorizonError
		switch {
		case errors.As(err, &never):
			fmt.Printf("%v °C: never, it tends to %v\n", target, never.Limit)
		case errors.As(err, &later):
			fmt.Printf("%v °C: not within %v\n", target, later.Horizon)
		case err != nil:
			log.Fatal(err)
		default:
			fmt.Printf("%v °C: after %s\n", target, wait.Text(units.Minute, 3))
		}
	}

	// Output:
	// 200 °C: after 29.6 min
	// 36 °C: not within 1 h
	// 30 °C: never, it tends to 35 °C
}

// How far is the number from the exact solution of the problem as stated?
func ExampleSolution_ErrorEstimate() {
	ball := fdm.Problem{
		Body:     shape.Sphere(units.Millimetre.Of(80)),
		Material: millSteel{},
		Initial:  units.Celsius.Of(850),
		Surface:  boundary.Constant(units.WattPerSquareMetreKelvin.Of(60), units.Celsius.Of(35)),
		Horizon:  units.Hour.Of(1),
	}
	solution, err := ball.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	off, err := solution.ErrorEstimate(shape.Centre(), units.Minute.Of(10))
	if err != nil {
		log.Fatal(err)
	}
	fmt.Println("off by less than 50 mK:", off.Compare(units.MillikelvinDifference.Of(50)) < 0)
	fmt.Println("heat lost in the balance, below 1e-11:", solution.EnergyBalance() < 1e-11)

	// Output:
	// off by less than 50 mK: true
	// heat lost in the balance, below 1e-11: true
}
