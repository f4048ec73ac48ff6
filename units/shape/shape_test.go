package shape_test

import (
	"errors"
	"fmt"
	"math"
	"testing"
	"testing/quick"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

func ExampleSphere() {
	ball := shape.Sphere(units.Millimetre.Of(60))
	fmt.Println(ball)
	fmt.Println("V/A", ball.VolumeToArea(), "for lumped analysis")
	fmt.Println("R", ball.ConductionLength(), "for Biot and Fourier numbers")
	fmt.Println("D", ball.FlowLength(), "for Nusselt, Reynolds and Rayleigh numbers")
	// Output:
	// sphere, diameter 60 mm
	// V/A 10 mm for lumped analysis
	// R 30 mm for Biot and Fourier numbers
	// D 60 mm for Nusselt, Reynolds and Rayleigh numbers
}

func ExampleBelow() {
	ball := shape.Sphere(units.Millimetre.Of(60))
	at, err := shape.Below(units.Millimetre.Of(6)).Position(ball)
	fmt.Printf("%.2f of the radius, %v\n", at, err)
	_, err = shape.Below(units.Millimetre.Of(31)).Position(ball)
	fmt.Println(err)
	// Output:
	// 0.80 of the radius, <nil>
	// place: depth: 31 mm not accepted; accepted: 0 m to 30 mm
}

// Archimedes: a sphere has two thirds of the volume and of the whole surface of the cylinder around it.
func TestSphereAgainstCylinder(t *testing.T) {
	f := func(x float64) bool {
		d := math.Exp(math.Mod(x, 20))
		b := shape.Sphere(units.Metre.Of(d))
		cylinderVolume := math.Pi / 4 * d * d * d
		cylinderArea := math.Pi*d*d + 2*math.Pi/4*d*d
		return math.Abs(b.Volume().SI()/cylinderVolume-2.0/3) < 1e-14 && math.Abs(b.Area().SI()/cylinderArea-2.0/3) < 1e-14 &&
			math.Abs(b.VolumeToArea().SI()*b.Area().SI()/b.Volume().SI()-1) < 1e-14
	}
	if err := quick.Check(f, nil); err != nil {
		t.Error(err)
	}
}

func TestRefusals(t *testing.T) {
	ball := shape.Sphere(units.Metre.Of(1))
	position := func(p shape.Place) error { _, err := p.Position(ball); return err }
	for _, tt := range []struct {
		name string
		err  error
	}{
		{"zero body", shape.Body{}.Check()},
		{"zero diameter", shape.Sphere(units.Length{}).Check()},
		{"negative diameter", shape.Sphere(units.Metre.Of(-1)).Check()},
		{"NaN", shape.Sphere(units.Metre.Of(math.NaN())).Check()},
		{"infinite", shape.Sphere(units.Metre.Of(math.Inf(1))).Check()},
		{"no place", position(shape.Place{})},
		{"mean has no position", position(shape.Mean())},
		{"too deep", position(shape.Below(units.Metre.Of(0.6)))},
		{"above the surface", position(shape.Below(units.Metre.Of(-0.1)))},
		{"NaN depth", position(shape.Below(units.Metre.Of(math.NaN())))},
	} {
		var a *units.ArgumentError
		if !errors.As(tt.err, &a) || a.Accepted == "" {
			t.Errorf("%s: %v; want an argument error", tt.name, tt.err)
		}
	}
	if err := ball.Check(); err != nil {
		t.Error(err)
	}
	for place, want := range map[shape.Place]float64{shape.Centre(): 0, shape.Surface(): 1, shape.Below(units.Metre.Of(0.5)): 0, shape.Below(units.Length{}): 1} {
		if at, err := place.Position(ball); err != nil || at != want {
			t.Errorf("%v is at %g, %v; want %g", place, at, err, want)
		}
	}
}
