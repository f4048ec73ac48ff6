package fdm_test

import (
	"context"
	"fmt"
	"math"
	"testing"

	"example.com/coolward/fdm"
	"example.com/coolward/internal/eigen"
	"example.com/coolward/internal/table"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// The whole solution with the run for the grid error: k(T), c(T), convection and radiation.
func BenchmarkSteelSphere(b *testing.B) {
	for _, c := range []struct {
		cells     int
		tolerance float64
	}{{50, 0}, {200, 0}, {50, 0.01}, {25, 0.1}} {
		b.Run(fmt.Sprintf("cells=%d/tolerance=%gK", c.cells, c.tolerance), func(b *testing.B) {
			p := steelSphere(c.cells)
			p.Tolerance = units.KelvinDifference.Of(c.tolerance)
			var s *fdm.Solution
			for b.Loop() {
				s = solve(b, p)
			}
			worst := 0.0
			_, rows := table.Read(b, "testdata/steel_sphere.csv")
			for _, row := range rows {
				place := shape.Centre()
				if row[1] == "surface" {
					place = shape.Surface()
				}
				worst = max(worst, math.Abs(at(b, s, place, table.Number(b, row[0]))-table.Number(b, row[2])))
			}
			report(b, s, worst)
		})
	}
}

// Constant properties and coefficient, Bi = 1, to Fo = 5; the time is linear in the number of cells.
func BenchmarkConstant(b *testing.B) {
	for _, cells := range []int{50, 100, 200, 400, 800} {
		b.Run(fmt.Sprintf("cells=%d", cells), func(b *testing.B) {
			p := scaled(1, cells)
			var s *fdm.Solution
			for b.Loop() {
				s = solve(b, p)
			}
			exact, worst := eigen.NewSphere(1), 0.0
			for fo := 0.01; fo < 5; fo *= 1.1 {
				worst = max(worst, math.Abs(at(b, s, shape.Centre(), fo*1e4)-300-100*exact.Centre(fo)))
			}
			report(b, s, worst)
		})
	}
}

func report(b *testing.B, s *fdm.Solution, worst float64) {
	st := s.Statistics()
	b.ReportMetric(worst*1e3, "mK-error")
	b.ReportMetric(float64(st.Steps), "steps")
	b.ReportMetric(float64(st.Evaluations), "evaluations")
}

func BenchmarkTimeTo(b *testing.B) {
	s, err := steelSphere(0).Solve(context.Background())
	if err != nil {
		b.Fatal(err)
	}
	for b.Loop() {
		if _, err := s.TimeTo(shape.Centre(), kelvin(400)); err != nil {
			b.Fatal(err)
		}
	}
}

func BenchmarkAt(b *testing.B) {
	s := solve(b, steelSphere(0))
	for b.Loop() {
		at(b, s, shape.Below(units.Millimetre.Of(3.3)), 777)
	}
}
