package property

import (
	"fmt"
	"math"
	"testing"
	"testing/quick"
)

// derivative checks that the specific heat is the derivative of the enthalpy, by central differences of order 4 (M.
// Abramowitz, I. A. Stegun, Handbook of Mathematical Functions, 25.3.6), and that Invert comes back.
func derivative(t *testing.T, what string, c Curve, low, high float64, kinks ...float64) {
	t.Helper()
	for i := 1; i < 200; i++ {
		x := low + (high-low)*float64(i)/200
		d := 1e-3 * (high - low) / 10
		nearKink := func() bool {
			for _, kink := range kinks {
				if math.Abs(x-kink) < 3*d {
					return true
				}
			}
			return false
		}
		if nearKink() || x-2*d < low || x+2*d > high {
			continue
		}
		slope := (8*(c.Enthalpy(x+d)-c.Enthalpy(x-d)) - (c.Enthalpy(x+2*d) - c.Enthalpy(x-2*d))) / (12 * d)
		near(t, fmt.Sprintf("%s: dh/dT at %g K", what, x), slope, c.SpecificHeat(x), 1e-6*c.SpecificHeat(x))
		near(t, fmt.Sprintf("%s: T(h) at %g K", what, x), Invert(c, c.Enthalpy(x), low, high), x, 1e-11*x)
	}
}

func TestSolidKernelsAreConsistent(t *testing.T) {
	food := FoodFractions{Protein: 0.2, Fat: 0.1, Carbohydrate: 0.05, Fibre: 0.02, Ash: 0.01, Water: 0.62}
	derivative(t, "food", NewFood(food, 271.15, 0, Dispersed), 233.15, 423.15, 271.15, 273.15)
	derivative(t, "timber", Timber(0.12), 293.15, 1073.15, 372.15, 393.15, 473.15, 523.15, 573.15, 623.15, 673.15, 773.15, 873.15)
	derivative(t, "stainless steel", StainlessSteel(), 293.15, 1473.15)
	derivative(t, "moist concrete", NewConcrete(1, 0.02), 293.15, 1473.15, 373.15, 388.15, 473.15, 673.15)
	derivative(t, "dry concrete", NewConcrete(0, 0), 293.15, 1473.15, 373.15, 473.15, 673.15)
	derivative(t, "moist steel", &Moist{CarbonSteel{}, 1.2, 0.1}, 280, 370)
	mix := &Mix{Series, []Part{{CarbonSteel{}, 0.5, 0.7}, {NewConcrete(1, 0.02), 0.5, 0.3}}}
	derivative(t, "mixture", mix, 293.15, 1000, 373.15, 388.15, 473.15, 673.15, 873.15)
}

// The structures of the mixture of a food in the limit of one component are that component, and all are between series
// and parallel.
func TestFoodConductivityIsBounded(t *testing.T) {
	property := func(a, b, c, d, e, f uint8, celsius int8) bool {
		sum := float64(a) + float64(b) + float64(c) + float64(d) + float64(e) + float64(f)
		if sum == 0 {
			return true
		}
		x := FoodFractions{float64(a) / sum, float64(b) / sum, float64(c) / sum, float64(d) / sum, float64(e) / sum, float64(f) / sum}
		T := zeroCelsius + min(max(float64(celsius), -40), 120)
		k := func(s Structure) float64 { return NewFood(x, 272, 0, s).Conductivity(T) }
		low, high := k(Series), k(Parallel)
		return low <= k(Geometric)*(1+1e-12) && k(Geometric) <= high*(1+1e-12) && low <= k(Dispersed)*(1+1e-12) && k(Dispersed) <= high*(1+1e-12)
	}
	if err := quick.Check(property, nil); err != nil {
		t.Error(err)
	}
}

// The pieces of a cubic are the cubic.
func TestPieces(t *testing.T) {
	whole := NewPieces(Piece{300, [4]float64{1, 2, 3, 4}, [4]float64{5, 6, 7, 8}})
	// The same about 310: Taylor's shift by hand.
	halves := NewPieces(
		Piece{300, [4]float64{1, 2, 3, 4}, [4]float64{5, 6, 7, 8}},
		Piece{310, [4]float64{4321, 1262, 123, 4}, [4]float64{8765, 2546, 247, 8}},
	)
	for x := 300.0; x <= 320; x += 0.7 {
		near(t, fmt.Sprintf("k at %g", x), halves.Conductivity(x), whole.Conductivity(x), 1e-9*whole.Conductivity(x))
		near(t, fmt.Sprintf("c at %g", x), halves.SpecificHeat(x), whole.SpecificHeat(x), 1e-9*whole.SpecificHeat(x))
		near(t, fmt.Sprintf("h at %g", x), halves.Enthalpy(x), whole.Enthalpy(x), 1e-9*(1+whole.Enthalpy(x)))
	}
}

// A constant without a range can be inverted.
func TestInvertWithoutAnUpperEnd(t *testing.T) {
	near(t, "T of 1 MJ/kg", Invert(Constant{1, 500}, 1e6, 0, math.Inf(1)), 2000, 1e-9)
}
