package lumped

import (
	"math"

	"gonum.org/v1/gonum/mat"
	"gonum.org/v1/gonum/stat/distuv"

	"example.com/coolward/internal/fit"
	"example.com/coolward/units"
)

// A ResidualTest is what the residuals of a fit say against one exponential with errors that are independent,
// normal and alike. Each probability is that of residuals at least as bad if there is nothing wrong; NaN is never
// among them: a test that could not be made has the probability 1 and is not Done.
type ResidualTest struct {
	// Neighbours is the test of J. Durbin and G. S. Watson (Biometrika 37 (1950) 409–428, 38 (1951) 159–178,
	// from memory): whether neighbouring readings are off to the same side. The statistic is near 2 if not.
	DurbinWatson float64
	Neighbours   Tested

	// Second is the F test of the term that a second time constant near the first would add, (t/τ)² exp(−t/τ)
	// (D. M. Bates, D. G. Watts, Nonlinear Regression Analysis and Its Applications, Wiley 1988, sec. 3.10,
	// from memory).
	Second Tested

	// Size is the chi-square test of the residuals against the stated noise.
	Size Tested
}

// A Tested is the outcome of one test.
type Tested struct {
	Done        bool
	Probability float64
}

// doubt is the probability below which one exponential is doubted.
const doubt = 0.01

// Test returns the tests of the residuals.
func (s *Fitted) Test() ResidualTest {
	if s.check() != nil || s.freedom == 0 {
		not := Tested{Probability: 1}
		return ResidualTest{Neighbours: not, Second: not, Size: not}
	}
	return s.test
}

// OneExponential reports whether the readings agree with one exponential: every test that could be made has a
// probability of 0.01 or above. True is no proof, least of all with a handful of readings.
func (s *Fitted) OneExponential() bool {
	if s.check() != nil {
		return false
	}
	t := s.Test()
	return min(t.Neighbours.Probability, t.Second.Probability, t.Size.Probability) >= doubt
}

// examine makes the tests.
func (s *Fitted) examine(columns *mat.Dense) ResidualTest {
	not := Tested{Probability: 1}
	test := ResidualTest{Neighbours: not, Second: not, Size: not}
	r := s.problem.Residuals(s.curve)
	term := make([]float64, len(r))
	for i, t := range s.seconds {
		w := math.Sqrt(s.problem.W[i])
		r[i] *= w
		x := t / s.curve.Tau
		term[i] = w * x * x * math.Exp(-x)
	}
	if s.curve.Squares <= float64(len(r))*leastDeviation*leastDeviation {
		return test // rounding is not independent
	}
	if d, p, ok := fit.DurbinWatson(r, columns); ok {
		test.DurbinWatson, test.Neighbours = d, Tested{true, p}
	}
	if p, ok := fit.Extra(r, columns, term); ok {
		test.Second = Tested{true, p}
	}
	if noise := s.fit.Noise.SI(); noise > 0 {
		law := distuv.ChiSquared{K: float64(s.freedom)}
		test.Size = Tested{true, law.Survival(s.curve.Squares / noise / noise)}
	}
	return test
}

// far is how many robust standard deviations off a reading is called an outlier (B. Iglewicz, D. C. Hoaglin,
// How to Detect and Handle Outliers, ASQC 1993, from memory).
const far = 3.5

// Outliers returns the places in the log of readings that are off by more than 3.5 standard deviations, the deviation
// taken from the median of all. Three degrees of freedom are needed, or none is found.
func (s *Fitted) Outliers() []int {
	if s.check() != nil || s.freedom < 3 {
		return nil
	}
	r := s.problem.Residuals(s.curve)
	scale := max(fit.Scale(r, s.problem.Free()), leastDeviation)
	var list []int
	for i, x := range r {
		if math.Abs(x) > far*scale {
			list = append(list, s.place[i])
		}
	}
	return list
}

// Residuals returns by how much the readings that are not missing lie above the curve, with their places in the log.
func (s *Fitted) Residuals() (place []int, residuals []units.TemperatureDifference) {
	if s.check() != nil {
		return nil, nil
	}
	for i, x := range s.problem.Residuals(s.curve) {
		place = append(place, s.place[i])
		residuals = append(residuals, units.KelvinDifference.Of(x))
	}
	return place, residuals
}
