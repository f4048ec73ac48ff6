package lumped_test

import (
	"context"
	"errors"
	"fmt"
	"log"
	"math"

	"example.com/coolward/lumped"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// A metal is a material with constant properties. A program would take one of package props.
type metal struct {
	density      units.Density
	specificHeat units.SpecificHeat
	conductivity units.Conductivity
}

func (m metal) Density() units.Density { return m.density }
func (m metal) Conductivity(units.Temperature) (units.Conductivity, error) {
	return m.conductivity, nil
}

func (m metal) SpecificHeat(units.Temperature) (units.SpecificHeat, error) {
	return m.specificHeat, nil
}

func (m metal) Enthalpy(t units.Temperature) (units.SpecificEnergy, error) {
	return units.JoulePerKilogram.Of(m.specificHeat.SI() * t.SI()), nil
}

func (m metal) Temperature(h units.SpecificEnergy) (units.Temperature, error) {
	return units.Kelvin.Of(h.SI() / m.specificHeat.SI()), nil
}

func (m metal) Range() (low, high units.Temperature) {
	return units.Kelvin.Of(100), units.Kelvin.Of(1300)
}
func (m metal) Kinks() []units.Temperature { return nil }
func (m metal) IsConstant() bool           { return true }

var copper = metal{
	density:      units.KilogramPerCubicMetre.Of(8930),
	specificHeat: units.JoulePerKilogramKelvin.Of(386),
	conductivity: units.WattPerMetreKelvin.Of(398),
}

// A copper slug of a heat-flux gauge, warmed to 120 °C, cools in a stream of air at 20 °C.
func Example() {
	solution, err := lumped.Problem{
		Body:     shape.Sphere(units.Millimetre.Of(10)),
		Material: copper,
		Initial:  units.Celsius.Of(120),
		Surface:  boundary.Constant(units.WattPerSquareMetreKelvin.Of(85), units.Celsius.Of(20)),
	}.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	t, err := solution.TimeTo(shape.Centre(), units.Celsius.Of(30))
	if err != nil {
		log.Fatal(err)
	}
	heat, err := solution.HeatReleased(t)
	if err != nil {
		log.Fatal(err)
	}
	lumping, err := solution.LumpingError(shape.Centre())
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("30 °C after %.1f s, %.1f J released\n", t.In(units.Second), heat.In(units.Joule))
	fmt.Printf("Bi %.5f, error of lumping at most %.2f K\n", solution.Biot().Volume, lumping.In(units.KelvinDifference))

	var never *units.NeverError
	if _, err = solution.TimeTo(shape.Centre(), units.Celsius.Of(20)); errors.As(err, &never) {
		fmt.Println(err)
	}
	// Output:
	// 30 °C after 155.6 s, 162.4 J released
	// Bi 0.00036, error of lumping at most 0.03 K
	// the centre never reaches 20 °C, it tends to 20 °C
}

// The bulb of a mercury thermometer, carried from a cellar into the sun: convection to the air and
// radiation that is absorbed. The exchange function may be anything.
func ExampleProblem_Solve_exchange() {
	bulb := metal{
		density:      units.KilogramPerCubicMetre.Of(13530),
		specificHeat: units.JoulePerKilogramKelvin.Of(139),
		conductivity: units.WattPerMetreKelvin.Of(8.5),
	}
	air := units.Celsius.Of(28)
	exchange := func(_ units.Duration, wall units.Temperature) (units.HeatFlux, error) {
		rise := wall.Sub(air).In(units.KelvinDifference)
		h := 18 + 2*math.Sqrt(math.Sqrt(math.Abs(rise))) // W/(m² K)
		const sun = 60                                   // W/m², absorbed, over the whole surface
		return units.WattPerSquareMetre.Of(h*rise - sun), nil
	}
	solution, err := lumped.Problem{
		Body:     shape.Sphere(units.Millimetre.Of(6)),
		Material: bulb,
		Initial:  units.Celsius.Of(12),
		Surface:  boundary.Function(exchange),
		Horizon:  units.Minute.Of(10),
	}.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	for _, target := range []float64{27, 28, 31, 40} {
		t, err := solution.TimeTo(shape.Mean(), units.Celsius.Of(target))
		var never *units.NeverError
		switch {
		case errors.As(err, &never):
			fmt.Printf("%g °C: never, it tends to %.1f °C %s\n", target, never.Limit.In(units.Celsius), never.Condition)
		case err != nil:
			log.Fatal(err)
		default:
			fmt.Printf("%g °C: %.0f s\n", target, t.In(units.Second))
		}
	}
	// Output:
	// 27 °C: 141 s
	// 28 °C: 168 s
	// 31 °C: never, it tends to 30.9 °C if conditions stay as at 10 min
	// 40 °C: never, it tends to 30.9 °C if conditions stay as at 10 min
}

// How much later the middle of a glass marble is cool than one temperature for the whole says.
func ExampleSolution_LumpingErrorInTime() {
	glass := metal{
		density:      units.KilogramPerCubicMetre.Of(2500),
		specificHeat: units.JoulePerKilogramKelvin.Of(840),
		conductivity: units.WattPerMetreKelvin.Of(1),
	}
	solution, err := lumped.Problem{
		Body:     shape.Sphere(units.Millimetre.Of(16)),
		Material: glass,
		Initial:  units.Celsius.Of(500),
		Surface:  boundary.Constant(units.WattPerSquareMetreKelvin.Of(40), units.Celsius.Of(30)),
	}.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	target := units.Celsius.Of(60)
	t, err := solution.TimeTo(shape.Centre(), target)
	if err != nil {
		log.Fatal(err)
	}
	late, err := solution.LumpingErrorInTime(shape.Centre(), target)
	if err != nil {
		log.Fatal(err)
	}
	fmt.Printf("lumped %.0f s, exact %.0f s later (Bi %.2f)\n", t.In(units.Second), late.In(units.Second), solution.Biot().Volume)
	// Output:
	// lumped 385 s, exact 39 s later (Bi 0.11)
}

// Everything a reader needs to check an answer by hand.
func ExampleSolution_Derivation() {
	solution, err := lumped.Problem{
		Body:     shape.Sphere(units.Millimetre.Of(12)),
		Material: copper,
		Initial:  units.Celsius.Of(120),
		Surface:  boundary.Constant(units.WattPerSquareMetreKelvin.Of(100), units.Celsius.Of(20)),
		Sources:  []string{"properties: data sheet of the supplier"},
	}.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}
	record := solution.Derivation()
	for _, symbol := range []string{"V/A", "h", "τ"} {
		value, _ := record.Value(symbol)
		fmt.Println(symbol, "=", value)
	}
	fmt.Println(record.Sources[len(record.Sources)-1])
	// Output:
	// V/A = 2 mm
	// h = 100 W/(m²·K)
	// τ = 1.14899 min
	// properties: data sheet of the supplier
}
