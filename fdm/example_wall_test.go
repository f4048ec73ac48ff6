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

// fixed is a material of constant properties, as in the tables of a building code.
type fixed struct {
	density      units.Density
	specificHeat units.SpecificHeat
	conductivity units.Conductivity
}

func (m fixed) Density() units.Density { return m.density }

func (m fixed) Conductivity(units.Temperature) (units.Conductivity, error) {
	return m.conductivity, nil
}

func (m fixed) SpecificHeat(units.Temperature) (units.SpecificHeat, error) {
	return m.specificHeat, nil
}

func (m fixed) Enthalpy(T units.Temperature) (units.SpecificEnergy, error) {
	return units.JoulePerKilogram.Of(m.specificHeat.SI() * T.SI()), nil
}

func (m fixed) Temperature(h units.SpecificEnergy) (units.Temperature, error) {
	return units.Kelvin.Of(h.SI() / m.specificHeat.SI()), nil
}

func (fixed) Range() (low, high units.Temperature) {
	return units.Celsius.Of(-50), units.Celsius.Of(300)
}

func (fixed) Kinks() []units.Temperature { return nil }

func properties(density, specificHeat, conductivity float64) fixed {
	return fixed{
		units.KilogramPerCubicMetre.Of(density), units.JoulePerKilogramKelvin.Of(specificHeat), units.WattPerMetreKelvin.Of(conductivity),
	}
}

// A garden sauna with walls of spruce on mineral wool: how warm is its outside, and what does the wall take, while the
// room is heated to 85 °C in half an hour and kept there for two?
func ExampleLayer() {
	room := boundary.Log(
		[]units.Duration{units.Minute.Of(0), units.Minute.Of(30), units.Minute.Of(150)},
		[]units.Temperature{units.Celsius.Of(12), units.Celsius.Of(85), units.Celsius.Of(85)},
	)
	wall := fdm.Problem{
		Body: shape.Plate(units.Millimetre.Of(115), units.SquareMetre.Of(9)).Exposing(shape.Front),
		Layers: []fdm.Layer{ // from the room outwards
			{Material: properties(450, 1600, 0.12), Thickness: units.Millimetre.Of(15)},
			{Material: properties(40, 1030, 0.036), Thickness: units.Millimetre.Of(80)},
			{Material: properties(450, 1600, 0.12), Thickness: units.Millimetre.Of(20)},
		},
		Initial:  units.Celsius.Of(12),
		Surface:  boundary.Following(units.WattPerSquareMetreKelvin.Of(10), room),
		Opposite: boundary.Constant(units.WattPerSquareMetreKelvin.Of(15), units.Celsius.Of(12)),
		Horizon:  units.Minute.Of(150),
	}
	solution, err := wall.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	end := solution.Horizon()
	outside, err := solution.At(shape.Opposite(), end)
	if err != nil {
		log.Fatal(err)
	}
	behind, err := solution.At(shape.Below(units.Millimetre.Of(15)), end)
	if err != nil {
		log.Fatal(err)
	}
	taken, err := solution.HeatThrough(shape.Surface(), end)
	if err != nil {
		log.Fatal(err)
	}
	fmt.Println("behind the boards", behind.Text(units.Celsius, 1))
	fmt.Println("outside", outside.Text(units.Celsius, 1))
	fmt.Println("into the wall", taken.Scale(-1).Text(units.KilowattHour, 3))

	// Output:
	// behind the boards 78.0 °C
	// outside 13.5 °C
	// into the wall 2.46 kW·h
}

// A dye bath in a steel kettle is left on the tiled floor of a workshop, all but its bottom in air: when is it at
// 21 °C? The bath is a lump at the floor, which is tiles on stone.
func ExampleLump() {
	floor := fdm.Problem{
		Body: shape.Plate(units.Centimetre.Of(40), units.SquareCentimetre.Of(700)).Exposing(shape.Front),
		Layers: []fdm.Layer{
			{Material: properties(2300, 840, 1.3), Thickness: units.Centimetre.Of(2), Contact: units.SquareMetreKelvinPerWatt.Of(0.01)},
			{Material: properties(2700, 850, 2.9), Thickness: units.Centimetre.Of(38)},
		},
		Initial: units.Celsius.Of(9),
		SurfaceLump: &fdm.Lump{
			HeatCapacity: units.KilojoulePerKelvin.Of(38), // nine litres
			Coefficient:  units.WattPerSquareMetreKelvin.Of(220),
			Initial:      units.Celsius.Of(80),
			Exchange:     boundary.Constant(units.WattPerSquareMetreKelvin.Of(9), units.Celsius.Of(9)),
			Area:         units.SquareCentimetre.Of(3200),
		},
		Horizon: units.Hour.Of(24),
	}
	solution, err := floor.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	wait, err := solution.LumpTimeTo(shape.Surface(), units.Celsius.Of(21))
	if err != nil {
		log.Fatal(err)
	}
	fmt.Println("at 21 °C after", wait.Text(units.Hour, 2))

	// Output:
	// at 21 °C after 5.5 h
}

// A glazed tile may be cooled as long as its surface is no more than 60 K colder than its middle. How fast, in a draught
// that is far too strong for it, does it come there?
func ExampleDiffers() {
	tile := fdm.Problem{
		Body:     shape.Plate(units.Millimetre.Of(24), units.SquareCentimetre.Of(400)),
		Material: properties(2100, 900, 0.9),
		Initial:  units.Celsius.Of(280),
		Surface:  boundary.Constant(units.WattPerSquareMetreKelvin.Of(120), units.Celsius.Of(20)),
		Horizon:  units.Minute.Of(30),
		Stop:     []fdm.Event{fdm.Differs(shape.Surface(), shape.Centre(), units.KelvinDifference.Of(60))},
	}
	solution, err := tile.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	event, at, stopped := solution.Stopped()
	fmt.Println(stopped, "after", at.Text(units.Second, 3)+":", event)
	tile.Stop = nil
	if solution, err = tile.Solve(context.Background()); err != nil {
		log.Fatal(err)
	}
	apart, when, err := solution.GreatestDifference(shape.Surface(), shape.Centre())
	if err != nil {
		log.Fatal(err)
	}
	fmt.Println("at most", apart.Text(units.KelvinDifference, 3), "after", when.Text(units.Second, 2))

	// Output:
	// true after 7.47 s: surface and centre apart by 60 K
	// at most -107 K after 57 s
}

// Which thickness of wool keeps the outside of an oven below 45 °C in the first four hours? A study solves for all of
// them at once.
func ExampleStudy() {
	oven := fdm.Problem{
		Initial:  units.Celsius.Of(20),
		Surface:  boundary.Temperature(units.Celsius.Of(250)),
		Opposite: boundary.Constant(units.WattPerSquareMetreKelvin.Of(8), units.Celsius.Of(20)),
		Horizon:  units.Hour.Of(4),
		Material: properties(100, 900, 0.06),
		Body:     shape.Plate(units.Millimetre.Of(20), units.SquareMetre.Of(1)).Exposing(shape.Front),
	}
	thickness := func(i int) units.Length { return units.Millimetre.Of(20 * float64(i+1)) }
	hottest, err := fdm.Study(
		context.Background(), oven, 5,
		func(i int, p *fdm.Problem) error {
			p.Body = shape.Plate(thickness(i), units.SquareMetre.Of(1)).Exposing(shape.Front)
			return nil
		},
		func(_ int, s *fdm.Solution, err error) (units.Temperature, error) {
			if err != nil {
				return units.Temperature{}, err
			}
			return s.At(shape.Opposite(), s.Horizon())
		},
	)
	if err != nil {
		log.Fatal(err)
	}
	for i, T := range hottest {
		fmt.Println(thickness(i), "of wool:", T.Text(units.Celsius, 0))
	}

	// Output:
	// 20 mm of wool: 83 °C
	// 40 mm of wool: 56 °C
	// 60 mm of wool: 46 °C
	// 80 mm of wool: 40 °C
	// 100 mm of wool: 36 °C
}

// A table of temperatures by the explicit scheme is to be checked. How long may its steps be on ten cells of a brick
// wall, and what does a fan at its face do to that?
func ExampleProblem_StepLimits() {
	brick := fdm.Problem{
		Body:     shape.Plate(units.Millimetre.Of(100), units.SquareMetre.Of(1)).Exposing(shape.Front),
		Material: properties(1800, 840, 0.72),
		Initial:  units.Celsius.Of(40),
		Horizon:  units.Hour.Of(1),
		Cells:    10,
		Uniform:  true,
	}
	for _, h := range []float64{10, 100} {
		brick.Surface = boundary.Constant(units.WattPerSquareMetreKelvin.Of(h), units.Celsius.Of(10))
		limits, err := brick.StepLimits()
		if err != nil {
			log.Fatal(err)
		}
		fmt.Println("h", h, "W/m²K: explicit up to", limits.Explicit.Text(units.Second, 4))
	}

	// Output:
	// h 10 W/m²K: explicit up to 92.2 s
	// h 100 W/m²K: explicit up to 43.95 s
}
