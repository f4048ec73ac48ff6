package shape_test

import (
	"errors"
	"math"
	"testing"
	"testing/quick"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// Where the places of bodies are, by the definitions: fraction of the way out, and depth below the surface.
func TestPlaces(t *testing.T) {
	plate := shape.Plate(mm(40), units.SquareMetre.Of(1))
	tube := shape.Tube(mm(50), mm(30), mm(500))
	for _, c := range []struct {
		name     string
		body     shape.Body
		place    shape.Place
		position float64 // NaN: refused
		depth    float64 // mm; NaN: refused
	}{
		{"middle of a plate", plate, shape.Centre(), 0, 20},
		{"back of a plate with two faces", plate, shape.Opposite(), 1, 40},
		{"beyond the middle", plate, shape.Below(mm(30)), math.NaN(), 30},
		{"insulated back", plate.Exposing(shape.Front), shape.Opposite(), 0, 40},
		{"insulated back is the centre", plate.Exposing(shape.Front), shape.Centre(), 0, 40},
		{"insulated front", plate.Exposing(shape.Back), shape.Opposite(), 0, 40},
		{"inside of a tube", tube, shape.Opposite(), 0, 10},
		{"inside of a tube, exposed", tube.Exposing(shape.Outside | shape.Inside), shape.Opposite(), 1, 10},
		{"outside of a tube, insulated", tube.Exposing(shape.Inside), shape.Opposite(), 0, 10},
		{"far end of a lagged rod", shape.Cylinder(mm(10), mm(80)).Exposing(shape.Ends), shape.Opposite(), 1, 80},
		{"inside of a shell", shape.HollowSphere(mm(50), mm(20)), shape.Opposite(), 0, 15},
		{"a sphere has one face", shape.Sphere(mm(50)), shape.Opposite(), math.NaN(), math.NaN()},
		{"a brick has no opposite", shape.Brick(mm(1), mm(2), mm(3)), shape.Opposite(), math.NaN(), math.NaN()},
		{"depth in a brick", shape.Brick(mm(10), mm(20), mm(30)), shape.Below(mm(2)), 0.6, 2},
		{"too deep", shape.Sphere(mm(50)), shape.Below(mm(25.1)), math.NaN(), math.NaN()},
		{"outside", shape.Sphere(mm(50)), shape.Below(mm(-1)), math.NaN(), math.NaN()},
		{"no number", shape.Sphere(mm(50)), shape.Below(mm(math.NaN())), math.NaN(), math.NaN()},
		{"the mean", plate, shape.Mean(), math.NaN(), math.NaN()},
		{"the slowest", plate, shape.Slowest(), math.NaN(), math.NaN()},
		{"the fastest", plate, shape.Fastest(), math.NaN(), math.NaN()},
		{"nowhere", plate, shape.Place{}, math.NaN(), math.NaN()},
	} {
		position, err := c.place.Position(c.body)
		checkPlace(t, c.name+": position", position, err, c.position)
		depth, err := c.place.Depth(c.body)
		checkPlace(t, c.name+": depth in mm", depth.In(units.Millimetre), err, c.depth)
	}
}

func checkPlace(t *testing.T, name string, got float64, err error, want float64) {
	t.Helper()
	var refused *units.ArgumentError
	switch {
	case math.IsNaN(want) && !errors.As(err, &refused):
		t.Errorf("%s is %g with error %v, want an *units.ArgumentError", name, got, err)
	case !math.IsNaN(want) && (err != nil || math.Abs(got-want) > 1e-12*(1+want)):
		t.Errorf("%s is %g with error %v, want %g to 1e-12", name, got, err, want)
	}
}

// The wall of a body of one coordinate: from the volume of the body between its two faces, which is the
// integral of the area, by Simpson's rule exact for areas up to the cube of the coordinate.
func TestThickness(t *testing.T) {
	f := func(x, y, z float64) bool {
		size := func(x float64) float64 { return math.Exp(math.Mod(x, 3)) }
		outer, length := size(x), size(z)
		inner := outer * (0.5 + 0.49*math.Sin(y))
		D, E, L := units.Metre.Of(outer), units.Metre.Of(inner), units.Metre.Of(length)
		middle := (outer + inner) / 2
		for _, c := range []struct {
			body             shape.Body
			first, mid, last float64 // area at the surface, halfway, at the other face
		}{
			{shape.Sphere(D), math.Pi * outer * outer, math.Pi * outer * outer / 4, 0},
			{shape.Cylinder(D, L).Exposing(shape.Outside), math.Pi * outer * length, math.Pi * outer * length / 2, 0},
			{shape.HollowSphere(D, E), math.Pi * outer * outer, math.Pi * middle * middle, math.Pi * inner * inner},
			{shape.Tube(D, E, L), math.Pi * outer * length, math.Pi * middle * length, math.Pi * inner * length},
			{shape.Plate(D, units.SquareMetre.Of(length)), length, length, length},
			{shape.Cylinder(D, L).Exposing(shape.Ends), math.Pi / 4 * outer * outer, math.Pi / 4 * outer * outer, math.Pi / 4 * outer * outer},
		} {
			want := c.body.Volume().SI() / ((c.first + 4*c.mid + c.last) / 6)
			if got := c.body.Thickness().SI(); math.Abs(got/want-1) > 1e-9 {
				t.Logf("%v: thickness %g m, want %g m to 1e-9", c.body, got, want)
				return false
			}
		}
		first, second, third := shape.Brick(D, E, L).Edges()
		return first == D && second == E && third == L &&
			shape.Brick(D, E, L).Thickness() == units.Length{} &&
			shape.Tube(D, E, L).InnerDiameter() == E && shape.Tube(D, E, L).Length() == L &&
			shape.Cylinder(D, L).Length() == L && shape.Sphere(D).InnerDiameter() == units.Length{} && shape.Sphere(D).Length() == units.Length{}
	}
	if err := quick.Check(f, nil); err != nil {
		t.Error(err)
	}
}
