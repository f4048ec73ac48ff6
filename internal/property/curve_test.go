package property

import (
	"errors"
	"fmt"
	"math"
	"testing"
	"testing/quick"
)

// The integral of e^x is known, and a power series shows no eight-point rule by chance.
func TestFunctionsIntegrateExactly(t *testing.T) {
	c := func(t float64) float64 { return math.Exp(t / 100) }
	f, err := NewFunctions(c, c, []float64{200, 450, 700})
	if err != nil {
		t.Fatal(err)
	}
	for x := 200.0; x <= 700; x += 12.5 {
		want := 100 * (math.Exp(x/100) - math.Exp(2))
		near(t, fmt.Sprintf("integral of exp(T/100 K) from 200 K to %g K", x), f.Enthalpy(x), want, 1e-12*math.Exp(7)*100)
	}
}

// A jump at a declared kink costs nothing; an undeclared one is found by halving.
func TestFunctionsIntegrateJumps(t *testing.T) {
	step := func(t float64) float64 {
		if t < 333 {
			return 500
		}
		return 800
	}
	for _, ends := range [][]float64{{300, 333, 400}, {300, 400}} {
		f, err := NewFunctions(step, step, ends)
		if err != nil {
			t.Fatal(ends, err)
		}
		near(t, fmt.Sprintf("integral of a step with ends %v", ends), f.Enthalpy(400), 33*500+67*800, 1e-6)
	}
}

func TestFunctionsRefuseNoise(t *testing.T) {
	noise := func(t float64) float64 { return 500 + 100*math.Sin(1e9*t) }
	if _, err := NewFunctions(noise, noise, []float64{300, 400}); !errors.Is(err, ErrRough) {
		t.Errorf("noise: got error %v, want %v", err, ErrRough)
	}
	nan := func(float64) float64 { return math.NaN() }
	if _, err := NewFunctions(nan, nan, []float64{300, 400}); !errors.Is(err, ErrRough) {
		t.Errorf("NaN: got error %v, want %v", err, ErrRough)
	}
}

// Monotone interpolation: between two rows a value lies between theirs, whatever the rows.
func TestTableDoesNotOvershoot(t *testing.T) {
	property := func(a, b, c, d, e uint16) bool {
		rows := []float64{float64(a) + 1, float64(b) + 1, float64(c) + 1, float64(d) + 1, float64(e) + 1}
		ts := []float64{250, 300, 320, 400, 700}
		tab, err := NewTable(ts, rows, rows)
		if err != nil {
			return false
		}
		for i := 1; i < len(ts); i++ {
			lo, hi := min(rows[i-1], rows[i]), max(rows[i-1], rows[i])
			for j := 0.0; j <= 1; j += 0.0625 {
				v := tab.Conductivity(ts[i-1] + j*(ts[i]-ts[i-1]))
				if v < lo-1e-9*hi || v > hi+1e-9*hi {
					return false
				}
			}
		}
		return true
	}
	if err := quick.Check(property, nil); err != nil {
		t.Error(err)
	}
}

// A straight line is its own interpolant, and its integral is a parabola.
func TestTableOfALine(t *testing.T) {
	ts := []float64{250, 300, 320, 400}
	c := make([]float64, len(ts))
	for i, x := range ts {
		c[i] = 100 + 2*x
	}
	tab, err := NewTable(ts, c, c)
	if err != nil {
		t.Fatal(err)
	}
	for x := 250.0; x <= 400; x += 3.7 {
		near(t, fmt.Sprintf("line at %g", x), tab.SpecificHeat(x), 100+2*x, 1e-9)
		near(t, fmt.Sprintf("integral of the line to %g", x), tab.Enthalpy(x), 100*(x-250)+x*x-250*250, 1e-7)
	}
	if h := tab.Enthalpy(249); !math.IsNaN(h) {
		t.Errorf("below the table: got %g, want NaN", h)
	}
}

// The inverse of a curve with a peak of 5000 J/(kg K) and two jumps.
func TestInvert(t *testing.T) {
	const low, high = 273.15, 1473.15
	for x := low; x <= high; x += 0.917 {
		h := CarbonSteel{}.Enthalpy(x)
		near(t, fmt.Sprintf("round trip at %g K", x), Invert(CarbonSteel{}, h, low, high), x, 1e-12*x)
	}
	near(t, "low end", Invert(CarbonSteel{}, CarbonSteel{}.Enthalpy(low), low, high), low, 0)
	near(t, "high end", Invert(CarbonSteel{}, CarbonSteel{}.Enthalpy(high), low, high), high, 0)
	near(t, "below", Invert(CarbonSteel{}, -1, low, high), low, 0)
	near(t, "above", Invert(CarbonSteel{}, 1e9, low, high), high, 0)
}
