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

// One reading in the middle of a copper ball in a bath gives the coefficient of the bath.
func ExampleProblem_FitCoefficient() {
	probe := series.Problem{
		Body:         shape.Sphere(units.Millimetre.Of(40)),
		Conductivity: units.WattPerMetreKelvin.Of(390),
		Density:      units.KilogramPerCubicMetre.Of(8930),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(386),
		Initial:      units.Celsius.Of(95),
		Surface:      boundary.Constant(units.HeatTransferCoefficient{}, units.Celsius.Of(18)), // h is what is asked for
	}
	fit, err := probe.FitCoefficient(context.Background(), series.Reading{
		Place:       shape.Centre(),
		Time:        units.Second.Of(20),
		Temperature: units.Celsius.Of(52),
		Error:       units.KelvinDifference.Of(0.5),
	})
	if err != nil {
		log.Fatal(err)
	}
	h, _, _ := fit.Problem.Surface.Constants()
	fmt.Printf("h = %s ± %.0f %%, Bi = %.2g\n", h.Text(units.WattPerSquareMetreKelvin, 3), 100*fit.BiotSpread, fit.Biot)
	// Output:
	// h = 966 W/(m²·K) ± 2 %, Bi = 0.05
}

// Core and surface of a cooling ham, read at one time, give both numbers of its cooling. Two readings of the core with
// the same thermometer tell far less.
func ExampleProblem_FitBiotAndDiffusivity() {
	ham := series.Problem{
		Body:         shape.Cylinder(units.Centimetre.Of(12), units.Centimetre.Of(30)),
		Conductivity: units.WattPerMetreKelvin.Of(0.5), // of no account
		Density:      units.KilogramPerCubicMetre.Of(1070),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(3300),
		Initial:      units.Celsius.Of(70),
		Surface:      boundary.Constant(units.HeatTransferCoefficient{}, units.Celsius.Of(2)),
	}
	read := func(place shape.Place, hours, celsius float64) series.Reading {
		return series.Reading{Place: place, Time: units.Hour.Of(hours), Temperature: units.Celsius.Of(celsius), Error: units.KelvinDifference.Of(0.3)}
	}
	core := read(shape.Centre(), 3, 38.6)
	for _, second := range []series.Reading{read(shape.Surface(), 3, 16.5), read(shape.Centre(), 4.5, 25.4)} {
		fit, err := ham.FitBiotAndDiffusivity(context.Background(), core, second)
		if err != nil {
			log.Fatal(err)
		}
		h, _, _ := fit.Problem.Surface.Constants()
		fmt.Printf("Bi = %.2g ± %.0f %%, diffusivity %s ± %.0f %%, h = %s\n", fit.Biot, 100*fit.BiotSpread,
			fit.Diffusivity.Text(units.SquareMillimetrePerSecond, 2), 100*fit.DiffusivitySpread, h.Text(units.WattPerSquareMetreKelvin, 2))
	}
	// Output:
	// Bi = 2.5 ± 4 %, diffusivity 0.11 mm²/s ± 3 %, h = 16 W/(m²·K)
	// Bi = 1.5 ± 41 %, diffusivity 0.13 mm²/s ± 21 %, h = 12 W/(m²·K)
}

// The surface of a thick acrylic model warms in a hot stream; a camera reads it after 30 s.
func ExampleSemiInfinite_FitCoefficient() {
	model := series.SemiInfinite{
		Conductivity: units.WattPerMetreKelvin.Of(0.19),
		Density:      units.KilogramPerCubicMetre.Of(1190),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(1470),
		Initial:      units.Celsius.Of(21),
		Surface:      boundary.Constant(units.HeatTransferCoefficient{}, units.Celsius.Of(60)),
	}
	h, err := model.FitCoefficient(context.Background(), units.Length{}, units.Second.Of(30), units.Celsius.Of(35.5))
	if err != nil {
		log.Fatal(err)
	}
	fmt.Println("h =", h.Text(units.WattPerSquareMetreKelvin, 2))
	// Output:
	// h = 50 W/(m²·K)
}

// Which number is worth a better look before the time in a chiller is trusted?
func ExampleSolution_TimeSensitivity() {
	cheese := series.Problem{
		Body:         shape.Brick(units.Centimetre.Of(10), units.Centimetre.Of(10), units.Centimetre.Of(30)),
		Conductivity: units.WattPerMetreKelvin.Of(0.35),
		Density:      units.KilogramPerCubicMetre.Of(1090),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(2900),
		Initial:      units.Celsius.Of(28),
		Surface:      boundary.Constant(units.WattPerSquareMetreKelvin.Of(14), units.Celsius.Of(4)),
	}
	solution, err := cheese.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	s, err := solution.TimeSensitivity(shape.Slowest(), units.Celsius.Of(8))
	if err != nil {
		log.Fatal(err)
	}
	minutes := func(d units.Duration) string { return d.Text(units.Minute, 2) }
	fmt.Println("core at 8 °C after", s.Time.Text(units.Hour, 2))
	fmt.Println("coefficient 20 % higher:", minutes(s.Coefficient.Scale(0.2)))
	fmt.Println("conductivity 10 % higher:", minutes(s.Conductivity.Scale(0.1)))
	fmt.Println("2 % larger:", minutes(s.Size.Scale(0.02)))
	fmt.Println("air 1 K warmer:", minutes(s.Ambient))
	// Output:
	// core at 8 °C after 5.7 h
	// coefficient 20 % higher: -32 min
	// conductivity 10 % higher: -18 min
	// 2 % larger: 10 min
	// air 1 K warmer: 32 min
}

// A loaf lies on a steel shelf in a blast of air: its three pairs of faces exchange differently.
func ExampleProduct() {
	blast := func(h float64) boundary.Condition {
		return boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), units.Celsius.Of(-5))
	}
	// in the order of the edges, the shortest first
	directions, err := series.DirectionsOf(shape.Brick(units.Centimetre.Of(8), units.Centimetre.Of(12), units.Centimetre.Of(25)),
		blast(60), blast(35), blast(20))
	if err != nil {
		log.Fatal(err)
	}
	loaf := series.Product{
		Directions:   directions,
		Conductivity: units.WattPerMetreKelvin.Of(0.4),
		Density:      units.KilogramPerCubicMetre.Of(950),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(3100),
		Initial:      units.Celsius.Of(75),
	}
	solution, err := loaf.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	t := units.Hour.Of(2)
	core, err := solution.At(t, shape.Centre(), shape.Centre(), shape.Centre())
	if err != nil {
		log.Fatal(err)
	}
	top, err := solution.At(t, shape.Surface(), shape.Centre(), shape.Centre())
	if err != nil {
		log.Fatal(err)
	}
	left, err := solution.HeatFraction(t)
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("after %v: core %s, middle of the top %s, %.0f %% of the heat has left\n", t, core.Text(units.Celsius, 1), top.Text(units.Celsius, 1), 100*left)
	// Output:
	// after 2 h: core 20.1 °C, middle of the top 0.5 °C, 86 % of the heat has left
}

// A potato has no exact solution, but it holds a ball and fits into a larger one, and its volume and its skin are known.
func ExampleProblem_Bracket() {
	potato := series.Problem{
		Body:         shape.Measured(units.CubicCentimetre.Of(180), units.SquareCentimetre.Of(163)),
		Conductivity: units.WattPerMetreKelvin.Of(0.55),
		Density:      units.KilogramPerCubicMetre.Of(1080),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(3600),
		Initial:      units.Celsius.Of(12),
		Surface:      boundary.Constant(units.WattPerSquareMetreKelvin.Of(1500), units.Celsius.Of(99)),
	}
	bracket, err := potato.Bracket(context.Background(), series.Envelope{
		Inside:  []shape.Body{shape.Sphere(units.Millimetre.Of(60))},
		Outside: []shape.Body{shape.Cylinder(units.Millimetre.Of(66), units.Metre.Of(1)).Exposing(shape.Outside)},
	})
	if err != nil {
		log.Fatal(err)
	}
	t, err := bracket.TimeTo(units.Celsius.Of(80))
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("core at 80 °C after %s to %s, likely %s\n", t.Fast.Text(units.Minute, 2), t.Slow.Text(units.Minute, 2), t.Likely.Text(units.Minute, 2))
	// Output:
	// core at 80 °C after 24 min to 45 min, likely 31 min
}

// The air in a kiln swings between 110 and 190 °C; the core of a cold brick warms and follows, late and by less.
func ExampleProblem_following() {
	air := boundary.Oscillation(units.Celsius.Of(150), units.KelvinDifference.Of(40), units.Hour.Of(1), units.Duration{})
	brick := series.Problem{
		Body:         shape.Brick(units.Millimetre.Of(250), units.Millimetre.Of(120), units.Millimetre.Of(65)),
		Conductivity: units.WattPerMetreKelvin.Of(0.8),
		Density:      units.KilogramPerCubicMetre.Of(1800),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(900),
		Initial:      units.Celsius.Of(20),
		Surface:      boundary.Following(units.WattPerSquareMetreKelvin.Of(25), air),
	}
	solution, err := brick.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	dry, err := solution.TimeTo(shape.Centre(), units.Celsius.Of(120))
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("core at 120 °C after %s\n", dry.Text(units.Minute, 2))
	for _, minutes := range []float64{15, 45, 90, 180} {
		t := units.Minute.Of(minutes)
		core, err := solution.At(shape.Centre(), t)
		if err != nil {
			log.Fatal(err)
		}
		fmt.Printf("core after %v: %s\n", t, core.Text(units.Celsius, 1))
	}
	// Output:
	// core at 120 °C after 65 min
	// core after 15 min: 50.3 °C
	// core after 45 min: 114.5 °C
	// core after 1.5 h: 148.6 °C
	// core after 3 h: 141.5 °C
}
