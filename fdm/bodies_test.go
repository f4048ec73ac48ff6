package fdm_test

import (
	"testing"

	"example.com/coolward/fdm"
	"example.com/coolward/internal/table"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// bodies have a conduction length of 0.1 m, so that the values of scaled hold for them. Half of a plate that is
// exposed on both faces is a plate that is exposed on one.
var bodies = map[string][]shape.Body{
	"plate": {
		shape.Plate(units.Metre.Of(0.2), units.SquareMetre.Of(3)),
		shape.Plate(units.Metre.Of(0.1), units.SquareMetre.Of(0.5)).Exposing(shape.Front),
		shape.Cylinder(units.Metre.Of(1), units.Metre.Of(0.2)).Exposing(shape.Ends),
	},
	"cylinder": {shape.Cylinder(units.Metre.Of(0.2), units.Metre.Of(0.7)).Exposing(shape.Outside)},
}

// Exact values of the series for plate and cylinder, testdata/plate_cylinder_series.csv (own computation with
// mpmath to 18 digits). 100 K of excess, 200 cells, from Fo = 0.01 on: 5 mK, as for the sphere.
func TestPlateAndCylinder(t *testing.T) {
	const tol = 0.005
	_, rows := table.Read(t, "testdata/plate_cylinder_series.csv")
	for form, list := range bodies {
		for _, body := range list {
			solutions := map[string]*fdm.Solution{}
			for _, row := range rows {
				if row[0] != form {
					continue
				}
				bi, time, x := row[1], table.Number(t, row[2])*1e4, row[3]
				if solutions[bi] == nil {
					p := scaled(table.Number(t, bi), 200)
					p.Body = body
					solutions[bi] = solve(t, p)
				}
				place := shape.Mean()
				if x != "avg" {
					place = below(table.Number(t, x))
				}
				if got, want := at(t, solutions[bi], place, time), 300+100*table.Number(t, row[4]); !near(got, want, tol) {
					t.Errorf("%v, Bi %s, %v at %g s: %.6f K, want %.6f K to %g K", body, bi, place, time, got, want, tol)
				}
			}
			if len(solutions) != 3 {
				t.Errorf("%v: %d Biot numbers checked", body, len(solutions))
			}
			heat := units.JoulePerKelvin.Of(1e6).Scale(body.Volume().SI()) // ρ c = 1e6 J/(m³ K)
			s := solutions["10"]
			got, err := s.HeatReleased(units.Second.Of(5e4))
			if want := 100 * heat.SI() * (1 - (at(t, s, shape.Mean(), 5e4)-300)/100); err != nil || !near(got.SI(), want, 1e-9*want) {
				t.Errorf("%v: heat %v, %v, want %g J", body, got, err, want)
			}
		}
	}
}

func TestOtherBodiesAreRefused(t *testing.T) {
	d := units.Metre.Of(0.2)
	for _, body := range []shape.Body{
		shape.Brick(d, d, d), shape.Cylinder(d, d), shape.Ring(d, d.Scale(0.5), d), shape.Cone(d, d),
		shape.Measured(units.CubicMetre.Of(1), units.SquareMetre.Of(6)),
	} {
		p := scaled(1, 0)
		p.Body = body
		if s, err := p.Solve(t.Context()); err == nil || s != nil {
			t.Errorf("%v: %v, want an error", body, err)
		}
	}
}
