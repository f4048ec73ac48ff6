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

func mm(x float64) units.Length { return units.Millimetre.Of(x) }

// A slab on an insulating board is exposed on one face, so that heat takes the whole thickness.
func ExampleBody_Exposing() {
	slab := shape.Plate(mm(30), units.SquareCentimetre.Of(150))
	fmt.Println(slab.ConductionLength(), slab.VolumeToArea())
	onBoard := slab.Exposing(shape.Front)
	fmt.Println(onBoard)
	fmt.Println(onBoard.ConductionLength(), onBoard.VolumeToArea())
	// Output:
	// 15 mm 15 mm
	// plate, thickness 30 mm, area of one face 150 cm², exposed front
	// 30 mm 30 mm
}

// Closed formulas of solid geometry (Euclid, Archimedes, Pappus) in a second form: Archimedes' two
// thirds for the sphere, Pappus' theorems for tube and capsule, differences for hollow bodies, the
// cone as a third of its cylinder.
func TestVolumesAndAreas(t *testing.T) {
	f := func(x, y, z float64) bool {
		size := func(x float64) float64 { return math.Exp(math.Mod(x, 5)) }
		d, e, l := size(x), size(x)*(0.5+0.49*math.Sin(y)), size(z)
		D, E, L := units.Metre.Of(d), units.Metre.Of(e), units.Metre.Of(l)
		all := shape.Outside | shape.Inside | shape.Ends
		full := shape.Cylinder(D, L)
		hole := shape.Cylinder(E, L)
		ring := shape.Ring(D, E, L)
		shell := shape.HollowSphere(D, E).Exposing(shape.Outside | shape.Inside)
		cone := shape.Cone(D, L)
		long := units.Metre.Of(d + l)
		capsule := shape.Capsule(D, long)
		meanRadius, wall := (d+e)/4, (d-e)/2
		for _, c := range []struct {
			name      string
			body      shape.Body
			v, a, tol float64
		}{
			{"sphere", shape.Sphere(D), 2.0 / 3 * math.Pi / 4 * d * d * d, 2.0 / 3 * (math.Pi*d*d + math.Pi/2*d*d), 1e-14},
			{"cylinder by Pappus", full, math.Pi * d / 2 * (d / 2 * l), math.Pi*d*l + math.Pi/2*d*d, 1e-14},
			{"cylinder, outside", full.Exposing(shape.Outside), full.Volume().SI(), full.Area().SI() - math.Pi/2*d*d, 1e-13 * (1 + d/l)},
			{"ring by Pappus", ring, 2 * math.Pi * meanRadius * wall * l, 2 * math.Pi * meanRadius * 2 * (wall + l), 1e-12},
			{"ring as a difference", ring, full.Volume().SI() - hole.Volume().SI(), full.Area().SI() + hole.Area().SI() - 4*math.Pi/4*e*e, 1e-12 * d / (d - e)},
			{"tube, all faces", shape.Tube(D, E, L).Exposing(all), ring.Volume().SI(), ring.Area().SI(), 1e-14},
			{"shell", shell, shape.Sphere(D).Volume().SI() - shape.Sphere(E).Volume().SI(), shape.Sphere(D).Area().SI() + shape.Sphere(E).Area().SI(), 1e-12 * d / (d - e)},
			{"cone", cone, full.Volume().SI() / 3, math.Pi/4*d*d + math.Pi*d/4*math.Sqrt(d*d+4*l*l), 1e-13},
			{"capsule", capsule, shape.Sphere(D).Volume().SI() + full.Volume().SI(), shape.Sphere(D).Area().SI() + full.Exposing(shape.Outside).Area().SI(), 1e-13},
			{"brick", shape.Brick(D, E, L), d * e * l, 2*d*e + 2*e*l + 2*d*l, 1e-14},
			{"plate", shape.Plate(D, units.SquareMetre.Of(e)), d * e, 2 * e, 1e-14},
			{"measured", shape.Measured(units.CubicMetre.Of(d), units.SquareMetre.Of(e)), d, e, 1e-14},
		} {
			if err := c.body.Check(); err != nil {
				t.Logf("%v: %v", c.body, err)
				return false
			}
			if math.Abs(c.body.Volume().SI()/c.v-1) > c.tol || math.Abs(c.body.Area().SI()/c.a-1) > c.tol {
				t.Logf("%s: volume %v, area %v; want %g m³, %g m² (tolerance %g)", c.name, c.body.Volume(), c.body.Area(), c.v, c.a, c.tol)
				return false
			}
		}
		return true
	}
	if err := quick.Check(f, nil); err != nil {
		t.Error(err)
	}
}

// The longest way out of a convex body lies between V/A (a plate) and 3V/A (a sphere): its inscribed sphere
// lies within it, and its volume is that of cones on its faces which are no higher than the body is deep.
func TestConductionLength(t *testing.T) {
	f := func(x, y, z float64) bool {
		size := func(x float64) units.Length { return units.Metre.Of(math.Exp(math.Mod(x, 3))) }
		for _, b := range []shape.Body{
			shape.Sphere(size(x)), shape.Cylinder(size(x), size(y)), shape.Cylinder(size(x), size(y)).Exposing(shape.Outside),
			shape.Cylinder(size(x), size(y)).Exposing(shape.Ends), shape.Plate(size(x), units.SquareMetre.Of(1)), shape.Brick(size(x), size(y), size(z)),
			shape.Cone(size(x), size(y)), shape.Capsule(size(x), size(x).Add(size(y))), shape.Measured(units.CubicMetre.Of(1), units.SquareMetre.Of(6)),
		} {
			ratio := b.ConductionLength().Ratio(b.VolumeToArea())
			if !(ratio >= 1-1e-12 && ratio <= 3+1e-12) {
				t.Logf("%v: way out %v is %g times V/A", b, b.ConductionLength(), ratio)
				return false
			}
		}
		return true
	}
	if err := quick.Check(f, nil); err != nil {
		t.Error(err)
	}
	for _, tt := range []struct {
		body   shape.Body
		want   float64 // mm
		family shape.Family
	}{
		{shape.Sphere(mm(60)), 30, shape.Spherical},
		{shape.HollowSphere(mm(60), mm(40)), 10, shape.HollowSpherical},
		{shape.HollowSphere(mm(60), mm(40)).Exposing(shape.Outside | shape.Inside), 5, shape.HollowSpherical},
		{shape.Cylinder(mm(60), mm(20)), 10, shape.Compact},
		{shape.Cylinder(mm(60), mm(20)).Exposing(shape.Outside), 30, shape.Cylindrical},
		{shape.Cylinder(mm(60), mm(20)).Exposing(shape.Ends), 10, shape.Planar},
		{shape.Tube(mm(60), mm(40), mm(500)), 10, shape.HollowCylindrical},
		{shape.Ring(mm(60), mm(40), mm(6)), 3, shape.Compact},
		{shape.Plate(mm(30), units.SquareMetre.Of(1)), 15, shape.Planar},
		{shape.Plate(mm(30), units.SquareMetre.Of(1)).Exposing(shape.Back), 30, shape.Planar},
		{shape.Brick(mm(30), mm(20), mm(50)), 10, shape.Compact},
		{shape.Cone(mm(60), mm(40)), 15, shape.Compact}, // 3-4-5 triangle: inscribed circle of base 60, height 40
		{shape.Cone(mm(60), mm(40)).Exposing(shape.Outside), 24, shape.Compact},
		{shape.Capsule(mm(20), mm(80)), 10, shape.Compact},
	} {
		if got := tt.body.ConductionLength().In(units.Millimetre); math.Abs(got-tt.want) > 1e-12*tt.want || tt.body.Family() != tt.family {
			t.Errorf("%v: way out %g mm, family %d; want %g mm, family %d", tt.body, got, tt.body.Family(), tt.want, tt.family)
		}
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
		{"negative edge", shape.Brick(mm(1), mm(1), mm(-1)).Check()},
		{"no inside", shape.HollowSphere(mm(10), units.Length{}).Check()},
		{"wall of nothing", shape.Tube(mm(10), mm(10), mm(5)).Check()},
		{"capsule shorter than round", shape.Capsule(mm(10), mm(9)).Check()},
		{"no face", shape.Sphere(mm(1)).Exposing(0).Check()},
		{"face of another form", shape.Plate(mm(1), units.SquareMetre.Of(1)).Exposing(shape.Outside).Check()},
		{"no area", shape.Plate(mm(1), units.Area{}).Check()},
		{"no volume", shape.Measured(units.Volume{}, units.SquareMetre.Of(1)).Check()},
		{"infinite area", shape.Measured(units.CubicMetre.Of(1), units.SquareMetre.Of(math.Inf(1))).Check()},
		{"volume beyond all numbers", shape.Sphere(units.Metre.Of(1e200)).Check()},
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

func TestCheckDoesNotAllocate(t *testing.T) {
	ball := shape.Sphere(mm(60))
	if n := testing.AllocsPerRun(100, func() { _ = ball.Check() }); n != 0 {
		t.Errorf("Check allocates %v times", n)
	}
}
