package shape_test

import (
	"errors"
	"math"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

func TestTabulatedProfile(t *testing.T) {
	depths := []units.Length{mm(0), mm(10), mm(30)}
	temperatures := []units.Temperature{units.Kelvin.Of(300), units.Kelvin.Of(400), units.Kelvin.Of(360)}
	profile, err := shape.TabulatedProfile(depths, temperatures)
	if err != nil {
		t.Fatal(err)
	}
	depths[0], temperatures[0] = mm(5), units.Kelvin.Of(1) // they are copied
	for _, c := range []struct{ depth, want float64 }{{0, 300}, {2.5, 325}, {10, 400}, {20, 380}, {30, 360}} {
		if T, err := profile(mm(c.depth)); err != nil || math.Abs(T.SI()-c.want) > 1e-9 {
			t.Errorf("at %g mm: %v, %v; want %g K, by hand", c.depth, T, err, c.want)
		}
	}
	for _, outside := range []float64{-1, 30.1, math.NaN()} {
		var r *units.RangeError
		if _, err := profile(mm(outside)); !errors.As(err, &r) {
			t.Errorf("at %g mm: %v, want a *units.RangeError", outside, err)
		}
	}
	good := []units.Temperature{units.Kelvin.Of(300), units.Kelvin.Of(300)}
	for _, c := range []struct {
		name         string
		depths       []units.Length
		temperatures []units.Temperature
	}{
		{"one depth", []units.Length{mm(0)}, good[:1]},
		{"fewer temperatures", []units.Length{mm(0), mm(1)}, good[:1]},
		{"depths that fall", []units.Length{mm(1), mm(0)}, good},
		{"a depth twice", []units.Length{mm(1), mm(1)}, good},
		{"negative depth", []units.Length{mm(-1), mm(0)}, good},
		{"NaN depth", []units.Length{mm(0), mm(math.NaN())}, good},
		{"forgotten temperature", []units.Length{mm(0), mm(1)}, []units.Temperature{units.Kelvin.Of(300), {}}},
	} {
		var refused *units.ArgumentError
		if _, err := shape.TabulatedProfile(c.depths, c.temperatures); !errors.As(err, &refused) {
			t.Errorf("%s: %v, want an *units.ArgumentError", c.name, err)
		}
	}
}
