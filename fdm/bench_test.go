package fdm_test

import (
	"context"
	"fmt"
	"math"
	"testing"

	"example.com/coolward/fdm"
	"example.com/coolward/internal/table"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// The reference problems with the estimate of the error, and with the grid that is chosen for 10 mK: whole solutions, from
// the check of the problem and the tables of the materials on. The error is the largest against the grid-converged values.
func BenchmarkReference(b *testing.B) {
	for _, name := range []string{"P1", "P2", "P3", "P4"} {
		for _, c := range []struct {
			cells     int
			tolerance float64
		}{{0, 0}, {50, 0.01}, {200, 0.1}, {200, 0.01}, {200, 0}, {1000, 0.01}} {
			title := fmt.Sprintf("%s/cells=%d/tolerance=%gK", name, c.cells, c.tolerance)
			if c.cells == 0 {
				title = name + "/accuracy=0.01K"
			}
			b.Run(title, func(b *testing.B) {
				p := steelSphere(c.cells)
				if name != "P2" {
					p = referenceProblems(c.cells)[name]
				}
				p.Tolerance = units.KelvinDifference.Of(c.tolerance)
				var s *fdm.Solution
				b.ReportAllocs()
				for b.Loop() {
					s = solve(b, p)
				}
				worst := 0.0
				for place, values := range referenceValues(b, name) {
					for time, want := range values {
						worst = max(worst, math.Abs(at(b, s, place, time)-want))
					}
				}
				report(b, s, worst)
			})
		}
	}
}

// referenceValues are the temperatures of a reference problem over time, at each place.
func referenceValues(t testing.TB, name string) map[shape.Place]map[float64]float64 {
	values := map[shape.Place]map[float64]float64{}
	add := func(place shape.Place, time, T string) {
		if values[place] == nil {
			values[place] = map[float64]float64{}
		}
		values[place][table.Number(t, time)] = table.Number(t, T)
	}
	if name == "P2" {
		_, rows := table.Read(t, "testdata/steel_sphere.csv")
		for _, row := range rows {
			add(map[string]shape.Place{"centre": shape.Centre(), "surface": shape.Surface()}[row[1]], row[0], row[2])
		}
		return values
	}
	for _, row := range table.Named(t, "testdata/reference_problems.csv") {
		if row["problem"] == name {
			add(referencePlaces[row["probe"]], row["time_s"], row["T_K"])
		}
	}
	return values
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
