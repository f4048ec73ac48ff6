package series_test

import (
	"context"
	"fmt"
	"log"

	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// The door of a pottery kiln is 60 mm of insulating brick. How long until its outside is too hot to touch, how hot does it get, and
// what does it let through?
func ExampleSolution_Flux() {
	door := series.Problem{
		Body:         shape.Plate(units.Millimetre.Of(60), units.SquareMetre.Of(0.5)),
		Conductivity: units.WattPerMetreKelvin.Of(0.25),
		Density:      units.KilogramPerCubicMetre.Of(800),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(1000),
		Initial:      units.Celsius.Of(20),
		Surface:      boundary.Constant(units.WattPerSquareMetreKelvin.Of(12), units.Celsius.Of(20)),
		Opposite:     boundary.Constant(units.WattPerSquareMetreKelvin.Of(60), units.Celsius.Of(700)),
	}
	solution, err := door.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	hot, err := solution.TimeTo(shape.Surface(), units.Celsius.Of(60))
	if err != nil {
		log.Fatal(err)
	}
	day := units.Hour.Of(24)
	outside, err := solution.At(shape.Surface(), day)
	if err != nil {
		log.Fatal(err)
	}
	q, err := solution.Flux(shape.Surface(), day)
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("outside at 60 °C after %s\n", hot.Text(units.Minute, 3))
	fmt.Printf("in the end %s and %s\n", outside.Text(units.Celsius, 1), q.Text(units.WattPerSquareMetre, 4))
	// Output:
	// outside at 60 °C after 27.5 min
	// in the end 186.7 °C and 2000 W/m²
}

// Steam of 140 °C is let into a cold pipe of cast iron with a thick wall. The inside follows at once, the outside later.
func ExampleProblem_Solve_tube() {
	pipe := series.Problem{
		Body:         shape.Tube(units.Millimetre.Of(170), units.Millimetre.Of(100), units.Metre.Of(1)),
		Conductivity: units.WattPerMetreKelvin.Of(52),
		Density:      units.KilogramPerCubicMetre.Of(7200),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(460),
		Initial:      units.Celsius.Of(10),
		Surface:      boundary.Constant(units.WattPerSquareMetreKelvin.Of(8), units.Celsius.Of(10)),
		Opposite:     boundary.Constant(units.WattPerSquareMetreKelvin.Of(6000), units.Celsius.Of(140)),
	}
	solution, err := pipe.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	t := units.Second.Of(20)
	for _, place := range []shape.Place{shape.Opposite(), shape.Below(units.Millimetre.Of(17.5)), shape.Surface()} {
		T, err := solution.At(place, t)
		if err != nil {
			log.Fatal(err)
		}
		fmt.Printf("%s after %s: %s\n", place, t, T.Text(units.Celsius, 1))
	}
	steam, err := solution.HeatThrough(shape.Opposite(), t)
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("taken from the steam: %s\n", steam.Neg().Text(units.Kilojoule, 4))
	// Output:
	// opposite face after 20 s: 102.4 °C
	// place 17.5 mm below the surface after 20 s: 46.8 °C
	// surface after 20 s: 29.6 °C
	// taken from the steam: 1972 kJ
}

// A battery cell is charged fast for ten minutes and slowly afterwards. How hot does its core get?
func ExampleProblem_sourceLog() {
	cell := series.Problem{
		Body:         shape.Cylinder(units.Millimetre.Of(46), units.Millimetre.Of(80)).Exposing(shape.Outside),
		Conductivity: units.WattPerMetreKelvin.Of(0.8),
		Density:      units.KilogramPerCubicMetre.Of(2700),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(1000),
		Initial:      units.Celsius.Of(25),
		Surface:      boundary.Constant(units.WattPerSquareMetreKelvin.Of(40), units.Celsius.Of(25)),
		SourceLog: []series.SourceReading{
			{Time: units.Minute.Of(0), Source: units.WattPerCubicMetre.Of(120e3)},
			{Time: units.Minute.Of(10), Source: units.WattPerCubicMetre.Of(120e3)},
			{Time: units.Minute.Of(10), Source: units.WattPerCubicMetre.Of(20e3)},
			{Time: units.Minute.Of(60), Source: units.WattPerCubicMetre.Of(10e3)},
		},
	}
	solution, err := cell.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	for _, minutes := range []float64{5, 10, 15, 60} {
		T, err := solution.At(shape.Centre(), units.Minute.Of(minutes))
		if err != nil {
			log.Fatal(err)
		}
		fmt.Printf("core after %g min: %s\n", minutes, T.Text(units.Celsius, 1))
	}
	// Output:
	// core after 5 min: 38.0 °C
	// core after 10 min: 48.5 °C
	// core after 15 min: 45.5 °C
	// core after 60 min: 31.8 °C
}

// A slab comes from a furnace with a skin that has cooled already. How does it even out under a cover?
func ExampleProblem_profile() {
	mm, celsius := units.Millimetre.Of, units.Celsius.Of
	start, err := shape.TabulatedProfile(
		[]units.Length{mm(0), mm(10), mm(30), mm(100)},
		[]units.Temperature{celsius(820), celsius(960), celsius(1080), celsius(1120)})
	if err != nil {
		log.Fatal(err)
	}
	slab := series.Problem{
		Body:         shape.Plate(mm(100), units.SquareMetre.Of(1)).Exposing(shape.Front),
		Conductivity: units.WattPerMetreKelvin.Of(28),
		Density:      units.KilogramPerCubicMetre.Of(7600),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(650),
		Profile:      start,
		Surface:      boundary.Constant(units.WattPerSquareMetreKelvin.Of(5), celsius(400)),
	}
	solution, err := slab.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	for _, minutes := range []float64{0, 1, 5, 20} {
		t := units.Minute.Of(minutes)
		skin, err := solution.At(shape.Surface(), t)
		if err != nil {
			log.Fatal(err)
		}
		back, err := solution.At(shape.Opposite(), t)
		if err != nil {
			log.Fatal(err)
		}
		fmt.Printf("after %g min: skin %s, back %s\n", minutes, skin.Text(units.Celsius, 0), back.Text(units.Celsius, 0))
	}
	// Output:
	// after 0 min: skin 820 °C, back 1120 °C
	// after 1 min: skin 993 °C, back 1108 °C
	// after 5 min: skin 1043 °C, back 1077 °C
	// after 20 min: skin 1051 °C, back 1057 °C
}
