package series_test

import (
	"context"
	"fmt"
	"log"
	"math"

	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
	"example.com/coolward/units/unitstest"
)

// centreOfBall stands for a function of another program that is to be tested: the centre of a ball by the first term of
// the series, with root and coefficient from a table of its own.
func centreOfBall(diameter, h, k, rho, c, start, ambient, seconds float64) float64 {
	const root, coefficient = 1.5708, 1.2732 // for h R/k = 1
	fourier := k / (rho * c) * seconds / (diameter * diameter / 4)
	return ambient + (start-ambient)*coefficient*math.Exp(-root*root*fourier)
}

// A printer takes the place of the *testing.T of a test.
type printer struct{}

func (printer) Helper()                           {}
func (printer) Errorf(format string, args ...any) { fmt.Printf(format+"\n", args...) }

// The test of a function of another program: a ball of 100 mm with h R/k = 1 in air of 20 °C. The function is compared
// with the exact solution, and the exact solution with a handbook, so that neither is taken on trust.
func Example_check() {
	t := printer{} // in a test: its t *testing.T

	ball := series.Problem{
		Body:         shape.Sphere(units.Millimetre.Of(100)),
		Conductivity: units.WattPerMetreKelvin.Of(0.5),
		Density:      units.KilogramPerCubicMetre.Of(1000),
		SpecificHeat: units.JoulePerKilogramKelvin.Of(3600),
		Initial:      units.Celsius.Of(80),
		Surface:      boundary.Constant(units.WattPerSquareMetreKelvin.Of(10), units.Celsius.Of(20)),
	}
	exact, err := ball.Solve(context.Background())
	if err != nil {
		log.Fatal(err)
	}

	// The handbook: Y. A. Çengel, Heat and Mass Transfer, 6th ed., table 4-2, Bi = 1, sphere: 1.5708 and 1.2732.
	modes, err := series.NewModes(shape.Spherical, exact.Biot())
	if err != nil {
		log.Fatal(err)
	}
	for _, c := range []struct {
		name        string
		table, ours float64
	}{{"root", 1.5708, modes.Term(1).Root}, {"coefficient", 1.2732, modes.Term(1).Coefficient}} {
		fmt.Printf("%s: table %v, exact %.4f, agree to half a digit: %v\n", c.name, c.table, c.ours, math.Abs(c.table-c.ours) <= 5e-5)
	}

	// The function, to 0.3 K.
	for _, hours := range []float64{0.5, 1, 2, 4, 8} {
		after := units.Hour.Of(hours)
		want, err := exact.At(shape.Centre(), after)
		if err != nil {
			log.Fatal(err)
		}
		got := units.Celsius.Of(centreOfBall(0.1, 10, 0.5, 1000, 3600, 80, 20, after.SI()))
		if unitstest.TemperatureWithin(t, want, got, units.KelvinDifference.Of(0.3), "centre after %v", after) {
			fmt.Printf("centre after %v: %s, right\n", after, got.Text(units.Celsius, 1))
		}
	}
	// Output:
	// root: table 1.5708, exact 1.5708, agree to half a digit: true
	// coefficient: table 1.2732, exact 1.2732, agree to half a digit: true
	// centre after 30 min
	// got  79.6883 °C
	// want 76.9583 °C
	// the difference is +2.73002 K, allowed are ±300 mK
	// centre after 1 h: 66.6 °C, right
	// centre after 2 h: 48.5 °C, right
	// centre after 4 h: 30.6 °C, right
	// centre after 8 h: 21.5 °C, right
}
