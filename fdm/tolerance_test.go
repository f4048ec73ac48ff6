package fdm_test

import (
	"fmt"
	"math"
	"testing"

	"example.com/coolward/fdm"
	"example.com/coolward/units"
)

// However loose the tolerance, an answer is not wrong by more than ten times as much: the reference problems at their places
// and times, against the same grid with steps that do not matter. That is an experience with these problems, among them one
// with a peak of the specific heat, which a solver in temperature may step over, and no bound.
func TestLooseTolerances(t *testing.T) {
	for _, name := range []string{"P1", "P2", "P3", "P4"} {
		p := steelSphere(100)
		if name != "P2" {
			p = referenceProblems(100)[name]
		}
		problem := func(tolerance float64) *fdm.Solution {
			p.Tolerance = units.KelvinDifference.Of(tolerance)
			return solve(t, p)
		}
		exact := problem(1e-5)
		values := referenceValues(t, name)
		if len(values) < 2 {
			t.Fatalf("%s: values of %d places", name, len(values))
		}
		line := ""
		for _, tolerance := range []float64{10, 3, 1, 0.3, 0.1, 0.03, 0.01, 3e-3, 1e-3} {
			s := problem(tolerance)
			worst := 0.0
			for place, over := range values {
				for time := range over {
					worst = math.Max(worst, math.Abs(at(t, s, place, time)-at(t, exact, place, time)))
				}
			}
			line += fmt.Sprintf(" %.2g", worst/tolerance)
			if !(worst <= 10*tolerance) {
				t.Errorf("%s, tolerance %g K: off by %g K", name, tolerance, worst)
			}
		}
		t.Logf("%s: error over tolerance from 10 K to 1 mK:%s", name, line)
	}
}
