package shape_test

import (
	"math"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// The exposed surfaces of the factors make up that of the body, each factor has its volume, and the first has
// its way out.
func TestFactors(t *testing.T) {
	for _, c := range []struct {
		body shape.Body
		want []float64 // ways out in mm
	}{
		{shape.Cylinder(mm(60), mm(100)), []float64{30, 50}},
		{shape.Cylinder(mm(60), mm(60)), []float64{30, 30}},
		{shape.Cylinder(mm(60), mm(20)), []float64{10, 30}},
		{shape.Brick(mm(30), mm(20), mm(50)), []float64{10, 15, 25}},
		{shape.Brick(mm(50), mm(30), mm(20)), []float64{10, 15, 25}},
		{shape.Sphere(mm(60)), []float64{30}},
		{shape.Plate(mm(60), units.SquareMetre.Of(2)).Exposing(shape.Back), []float64{60}},
		{shape.Cylinder(mm(60), mm(20)).Exposing(shape.Ends), []float64{10}},
		{shape.Cone(mm(60), mm(20)), nil},
		{shape.Measured(units.CubicMetre.Of(1), units.SquareMetre.Of(9)), nil},
		{shape.Ring(mm(60), mm(40), mm(6)), nil},
		{shape.Body{}, nil},
	} {
		factors := c.body.Factors()
		if len(factors) != len(c.want) {
			t.Errorf("%v: factors %v, want %d", c.body, factors, len(c.want))
			continue
		}
		if len(factors) == 0 {
			continue
		}
		area := 0.0
		for i, f := range factors {
			area += f.Area().SI()
			if got := f.ConductionLength().In(units.Millimetre); math.Abs(got-c.want[i]) > 1e-12*c.want[i] {
				t.Errorf("%v: way out of %v is %g mm, want %g mm", c.body, f, got, c.want[i])
			}
			if ratio := f.Volume().Ratio(c.body.Volume()); math.Abs(ratio-1) > 1e-14 {
				t.Errorf("%v: volume of %v is %g times that of the body", c.body, f, ratio)
			}
			if err := f.Check(); err != nil || f.Family() == shape.Compact {
				t.Errorf("%v: factor %v, family %d, %v", c.body, f, f.Family(), err)
			}
		}
		if ratio := area / c.body.Area().SI(); math.Abs(ratio-1) > 1e-14 {
			t.Errorf("%v: the factors have %g times its surface", c.body, ratio)
		}
		if got, want := factors[0].ConductionLength(), c.body.ConductionLength(); got != want {
			t.Errorf("%v: nearest face at %v, want %v", c.body, got, want)
		}
	}
}
