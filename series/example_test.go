package series_test

import (
	"context"
	"errors"
	"fmt"
	"log"

	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// A glass marble of 16 mm leaves an oven at 90 °C and rolls into a stirred bath at 20 °C.
func ExampleProblem_Solve() {
	marble := series.Problem{
		Body:         shape.Sphere(units.Millimetre.Of(16)),
		Conductivity: units.WattPerMetreKelvin.Of(1.0),
		Density:      units.KilogramPerCubicMetre.Of(2500),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(800),
		Initial:      units.Celsius.Of(90),
		Surface:      boundary.Constant(units.WattPerSquareMetreKelvin.Of(300), units.Celsius.Of(20)),
	}
	solution, err := marble.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("Bi = %.3g\n", solution.Biot())

	t := units.Second.Of(10)
	for _, place := range []shape.Place{shape.Centre(), shape.Below(units.Millimetre.Of(4)), shape.Surface(), shape.Mean()} {
		T, err := solution.At(place, t)
		if err != nil {
			log.Fatal(err)
		}
		fmt.Printf("%s after %v: %s\n", place, t, T.Text(units.Celsius, 1))
	}
	q, err := solution.HeatReleased(t)
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("heat given to the bath: %s\n", q.Text(units.Joule, 4))

	ready, err := solution.TimeTo(shape.Centre(), units.Celsius.Of(40))
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("centre at 40 °C after %s\n", ready.Text(units.Second, 3))
	// Output:
	// Bi = 2.4
	// centre after 10 s: 86.7 °C
	// place 4 mm below the surface after 10 s: 79.5 °C
	// surface after 10 s: 51.1 °C
	// mean after 10 s: 66.3 °C
	// heat given to the bath: 101.6 J
	// centre at 40 °C after 46.8 s
}

// A ceramic ball in a bath of 20 °C comes to 20 °C, and never below.
func ExampleSolution_TimeTo() {
	ball := series.Problem{
		Body:         shape.Sphere(units.Millimetre.Of(30)),
		Conductivity: units.WattPerMetreKelvin.Of(25),
		Density:      units.KilogramPerCubicMetre.Of(3900),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(880),
		Initial:      units.Celsius.Of(250),
		Surface:      boundary.Constant(units.WattPerSquareMetreKelvin.Of(900), units.Celsius.Of(20)),
	}
	solution, err := ball.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	for _, target := range []units.Temperature{units.Celsius.Of(60), units.Celsius.Of(15)} {
		t, err := solution.TimeTo(shape.Centre(), target)
		var never *units.NeverError
		switch {
		case errors.As(err, &never):
			fmt.Printf("%v: never, the %s tends to %v\n", target, never.Place, never.Limit)
		case err != nil:
			log.Fatal(err)
		default:
			fmt.Printf("%v: after %s\n", target, t.Text(units.Second, 3))
		}
	}
	// Output:
	// 60 °C: after 40.2 s
	// 15 °C: never, the centre tends to 20 °C
}
