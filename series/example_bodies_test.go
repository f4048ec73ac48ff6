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

// A loaf of cheese, 10 × 10 × 30 cm, is put into a cold store. The corner of a block cools much faster than its core.
func Example_brick() {
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
	t := units.Hour.Of(3)
	core, err := solution.At(shape.Centre(), t)
	if err != nil {
		log.Fatal(err)
	}
	corner, err := solution.AtPoint(t, units.Centimetre.Of(5), units.Centimetre.Of(5), units.Centimetre.Of(15))
	if err != nil {
		log.Fatal(err)
	}
	ready, err := solution.TimeTo(shape.Centre(), units.Celsius.Of(8))
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("after %s: core %s, corner %s\n", t, core.Text(units.Celsius, 1), corner.Text(units.Celsius, 1))
	fmt.Printf("core at 8 °C after %s\n", ready.Text(units.Hour, 3))
	// Output:
	// after 3 h: core 15.0 °C, corner 4.8 °C
	// core at 8 °C after 5.66 h
}

// A store whose temperature a logger has recorded: it warms when the door is open, and is pulled down again.
func ExampleSolution_Track() {
	carton := series.Problem{
		Body:         shape.Plate(units.Centimetre.Of(6), units.SquareMetre.Of(1)),
		Conductivity: units.WattPerMetreKelvin.Of(0.5),
		Density:      units.KilogramPerCubicMetre.Of(1000),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(3600),
		Initial:      units.Celsius.Of(3),
		Surface:      boundary.Constant(units.WattPerSquareMetreKelvin.Of(12), units.Celsius.Of(3)),
	}
	solution, err := carton.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	track, err := solution.Track(shape.Surface())
	if err != nil {
		log.Fatal(err)
	}
	for _, sample := range []struct{ minutes, celsius float64 }{{60, 3}, {70, 15}, {90, 16}, {110, 5}, {180, 3}} {
		T, err := track.Add(units.Minute.Of(sample.minutes), units.Celsius.Of(sample.celsius))
		if err != nil {
			log.Fatal(err)
		}
		fmt.Printf("%3v min: air %2v °C, surface %s\n", sample.minutes, sample.celsius, T.Text(units.Celsius, 2))
	}
	// Output:
	// 60 min: air  3 °C, surface 3.00 °C
	//  70 min: air 15 °C, surface 4.72 °C
	//  90 min: air 16 °C, surface 6.75 °C
	// 110 min: air  5 °C, surface 5.69 °C
	// 180 min: air  3 °C, surface 4.44 °C
}

// How deep does a frost of 40 days go, and when does it reach a pipe half a metre deep?
func ExampleSemiInfinite() {
	soil := series.SemiInfinite{
		Conductivity: units.WattPerMetreKelvin.Of(0.9),
		Density:      units.KilogramPerCubicMetre.Of(1800),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(1500),
		Initial:      units.Celsius.Of(9),
		Surface:      boundary.Temperature(units.Celsius.Of(-8)),
	}
	solution, err := soil.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	freezing := units.Celsius.Of(0)
	depth, err := solution.Depth(freezing, units.Day.Of(40))
	if err != nil {
		log.Fatal(err)
	}
	t, err := solution.TimeTo(units.Metre.Of(0.5), freezing)
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("0 °C is %s deep after 40 days, and half a metre deep after %s\n", depth.Text(units.Metre, 3), t.Text(units.Day, 3))
	// Output:
	// 0 °C is 0.955 m deep after 40 days, and half a metre deep after 11 d
}

// A bare foot steps on tiles and on cork of the same temperature.
func ExampleContact() {
	skin := series.Side{Effusivity: units.JoulePerSquareMetreKelvinRootSecond.Of(1200), Temperature: units.Celsius.Of(32)}
	for _, floor := range []struct {
		name       string
		effusivity float64
	}{{"tiles", 1500}, {"cork", 130}} {
		T, err := series.Contact(skin, series.Side{
			Effusivity:  units.JoulePerSquareMetreKelvinRootSecond.Of(floor.effusivity),
			Temperature: units.Celsius.Of(18),
		})
		if err != nil {
			log.Fatal(err)
		}
		fmt.Printf("%s: %s\n", floor.name, T.Text(units.Celsius, 1))
	}
	// Output:
	// tiles: 24.2 °C
	// cork: 30.6 °C
}

// Roots and coefficients for a chart of one's own, and how far its first term is off.
func ExampleNewModes() {
	modes, err := series.NewModes(shape.Cylindrical, 2)
	if err != nil {
		log.Fatal(err)
	}
	for n := 1; n <= 3; n++ {
		term := modes.Term(n)
		fmt.Printf("term %d: root %.4f, coefficient %+.4f\n", n, term.Root, term.Coefficient)
	}
	for _, fo := range []float64{0.05, 0.2, 1} {
		first, _ := modes.OneTerm(0, fo)
		fmt.Printf("Fo %4v: centre %.4f, first term %.4f\n", fo, modes.Theta(0, fo), first)
	}
	// Output:
	// term 1: root 1.5994, coefficient +1.3384
	// term 2: root 4.2910, coefficient -0.4923
	// term 3: root 7.2884, coefficient +0.2422
	// Fo 0.05: centre 0.9980, first term 1.1777
	// Fo  0.2: centre 0.7900, first term 0.8024
	// Fo    1: centre 0.1036, first term 0.1036
}
