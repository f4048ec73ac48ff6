package fdm_test

import (
	"math"
	"testing"

	"example.com/coolward/fdm"
	"example.com/coolward/internal/eigen"
	"example.com/coolward/internal/table"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// places of the exact solution, by the fraction of the radius; the mean is the last.
var fractions = []float64{0, 0.3, 0.7, 1}

// Exact values of the series for the sphere, testdata/sphere_series.csv (own computation with mpmath to 18
// digits, checked there against a Laplace inversion). 100 K of excess, 200 cells, from Fo = 0.01 on: 5 mK.
func TestSeriesValues(t *testing.T) {
	const tol = 0.005
	solutions := map[string]func(x string, time float64) float64{}
	for _, bi := range []string{"0.1", "1", "10"} {
		s := solve(t, scaled(table.Number(t, bi), 200))
		solutions[bi] = func(x string, time float64) float64 {
			if x == "avg" {
				return at(t, s, shape.Mean(), time)
			}
			return at(t, s, below(table.Number(t, x)), time)
		}
	}
	checked := 0
	_, rows := table.Read(t, "testdata/sphere_series.csv")
	for _, row := range rows {
		bi, fo, x, theta := row[1], table.Number(t, row[2]), row[3], table.Number(t, row[4])
		if fo < 0.01 || fo > 5 {
			continue
		}
		checked++
		if got, want := solutions[bi](x, fo*1e4), 300+100*theta; !near(got, want, tol) {
			t.Errorf("Bi %s, Fo %g, x %s: %.6f K, want %.6f K to %g K", bi, fo, x, got, want, tol)
		}
	}
	if checked < 60 {
		t.Errorf("%d values checked, want at least 60", checked)
	}
}

// A scan in time against the exact solution: 5 mK with 200 cells from Fo = 0.01 on, and at all times within
// the estimate of the solution itself, with the default number of cells too. Before Fo = 1e-4 the coarse
// grid of the estimate does not resolve the boundary layer.
func TestSeriesScan(t *testing.T) {
	for _, cells := range []int{0, 24, 200} {
		for _, bi := range []float64{0.1, 1, 10} {
			s, exact := solve(t, scaled(bi, cells)), eigen.NewSphere(bi)
			for fo := 1e-4; fo < 5; fo *= 1.07 {
				for i := range len(fractions) + 1 {
					place, want := shape.Mean(), 300+100*exact.Mean(fo)
					if i < len(fractions) {
						place, want = below(fractions[i]), 300+100*exact.At(fractions[i], fo)
					}
					got := at(t, s, place, fo*1e4)
					if tol := 0.005; cells == 200 && fo >= 0.01 && !near(got, want, tol) {
						t.Errorf("Bi %g, Fo %g, %v: %.6f K, want %.6f K to %g K", bi, fo, place, got, want, tol)
					}
					if tol := estimate(t, s, place, fo*1e4); !near(got, want, tol) {
						t.Errorf("%d cells, Bi %g, Fo %g, %v: %.6f K, want %.6f K to the estimate %g K", cells, bi, fo, place, got, want, tol)
					}
				}
			}
		}
	}
}

// Times against the exact solution: the error of temperature over its rate.
func TestTimesAgainstSeries(t *testing.T) {
	for _, bi := range []float64{0.1, 1, 10} {
		p := scaled(bi, 200)
		p.Horizon = seconds(2e5)
		s, exact := solve(t, p), eigen.NewSphere(bi)
		for _, target := range []float64{395, 350, 310, 301} {
			got, err := s.TimeTo(shape.Centre(), kelvin(target))
			if err != nil {
				t.Fatal(err)
			}
			// The exact temperature at that time is the target.
			if T := 300 + 100*exact.Centre(got.SI()*1e-4); !near(T, target, 0.005) {
				t.Errorf("Bi %g, centre at %g K: the exact temperature at %v is %.6f K, want it to 5 mK", bi, target, got, T)
			}
			if T := at(t, s, shape.Centre(), got.SI()); !near(T, target, 1e-9) {
				t.Errorf("Bi %g: at the time of %g K the solution itself gives %.12g K", bi, target, T)
			}
		}
	}
}

// Order 4 in space, of what is extrapolated from order 2, less at the centre of graded cells: errors against the exact solution on three grids, with steps that do not matter.
func TestOrderInSpace(t *testing.T) {
	for _, bi := range []float64{0.1, 1, 10} {
		exact := eigen.NewSphere(bi)
		err := func(cells int) (e [3]float64) {
			p := scaled(bi, cells)
			p.Tolerance, p.Horizon = units.KelvinDifference.Of(1e-7), seconds(3000)
			s := solve(t, p)
			for i, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean()} {
				want := []float64{exact.Centre(0.3), exact.Surface(0.3), exact.Mean(0.3)}[i]
				e[i] = at(t, s, place, 3000) - 300 - 100*want
			}
			return e
		}
		e20, e40, e80 := err(20), err(40), err(80)
		for i, place := range []string{"centre", "surface", "mean"} {
			for _, p := range []float64{math.Log2(math.Abs(e20[i] / e40[i])), math.Log2(math.Abs(e40[i] / e80[i]))} {
				if !(p > 3.4) && math.Abs(e20[i]) > 1e-6 { // below that an error changes its sign from grid to grid
					t.Errorf("Bi %g, %s: order %.3f from errors %g, %g, %g K, want 3.4 or more", bi, place, p, e20[i], e40[i], e80[i])
				}
			}
		}
	}
}

// Order 2 ± 0.05 in space of a grid by itself, which is what is reported where nothing is extrapolated: of a material that
// may change for good, but does not come to it; errors against the exact series, with steps that do not matter.
func TestOrderOfOneGrid(t *testing.T) {
	for _, bi := range []float64{0.1, 1, 10} {
		exact := eigen.NewSphere(bi)
		err := func(cells int) (e [3]float64) {
			p := scaled(bi, cells)
			p.Material = fdm.Changing{Material: plain{1000, 1000, 1}, At: kelvin(4000), Into: plain{1000, 1000, 2}}
			p.Tolerance, p.Horizon = units.KelvinDifference.Of(1e-6), seconds(3000)
			s := solve(t, p)
			for i, place := range []shape.Place{shape.Centre(), shape.Surface(), shape.Mean()} {
				want := []float64{exact.Centre(0.3), exact.Surface(0.3), exact.Mean(0.3)}[i]
				e[i] = at(t, s, place, 3000) - 300 - 100*want
			}
			return e
		}
		e1, e2, e3 := err(40), err(80), err(160)
		for i, place := range []string{"centre", "surface", "mean"} {
			for _, p := range []float64{math.Log2(e1[i] / e2[i]), math.Log2(e2[i] / e3[i])} {
				if !near(p, 2, 0.05) {
					t.Errorf("Bi %g, %s: order %.3f from errors %g, %g, %g K, want 2 ± 0.05", bi, place, p, e1[i], e2[i], e3[i])
				}
			}
		}
	}
}

// The steel sphere with k(T), c(T), natural convection and radiation, against the grid-converged
// temperatures of testdata/steel_sphere.csv (SUNDIALS CVODE, confirmed with SciPy Radau).
func TestSteelSphere(t *testing.T) {
	_, rows := table.Read(t, "testdata/steel_sphere.csv")
	for _, cells := range []int{25, 50, 100, 200} {
		s := solve(t, steelSphere(cells))
		worst, allowed := 0.0, 0.0
		for _, row := range rows {
			time, want := table.Number(t, row[0]), table.Number(t, row[2])
			place := map[string]shape.Place{"centre": shape.Centre(), "surface": shape.Surface()}[row[1]]
			got, tol := at(t, s, place, time), estimate(t, s, place, time)
			worst, allowed = max(worst, math.Abs(got-want)), max(allowed, tol)
			if !near(got, want, tol) {
				t.Errorf("%d cells, %s at %g s: %.7f K, want %.7f K to the estimate %g K", cells, row[1], time, got, want, tol)
			}
		}
		// An estimate must also be of use: the reference scheme with 50 uniform cells is off by 0.8 mK.
		if allowed > 0.05 {
			t.Errorf("%d cells: estimate %g K for an error of %g K", cells, allowed, worst)
		}
		t.Logf("%d cells: error %.2g K, estimate up to %.2g K, %+v", cells, worst, allowed, s.Statistics())
	}
}

// The error falls with the tolerance, and stays below three times that of one step, which holds the mean square over the
// volume while a place may be off by more; and within its own estimate.
func TestToleranceAndError(t *testing.T) {
	p := steelSphere(50)
	p.Tolerance = units.KelvinDifference.Of(1e-8)
	exact := solve(t, p)
	for _, tol := range []float64{1, 0.1, 0.01, 1e-3, 1e-4, 1e-5} {
		p.Tolerance = units.KelvinDifference.Of(tol)
		s := solve(t, p)
		worst := 0.0
		for time := 1.0; time <= 3600; time *= 1.1 {
			for _, x := range []float64{0, 0.5, 1} {
				place := shape.Below(units.Millimetre.Of(25 * (1 - x)))
				e := math.Abs(at(t, s, place, time) - at(t, exact, place, time))
				worst = max(worst, e)
				if own, err := s.StepError(place, seconds(time)); err != nil || e > own.SI() {
					t.Errorf("tolerance %g K, %v at %.4g s: error in time %.3g K, estimate %v (%v)", tol, place, time, e, own, err)
				}
			}
		}
		if worst > 3*tol {
			t.Errorf("tolerance %g K: error in time %g K, want at most three times", tol, worst)
		}
		t.Logf("tolerance %g K: error in time %.2g K in %d steps", tol, worst, s.Statistics().Steps)
	}
}
