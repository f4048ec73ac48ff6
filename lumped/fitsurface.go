package lumped

import (
	"context"
	"fmt"
	"math"
	"slices"

	"gonum.org/v1/gonum/mat"
	"gonum.org/v1/gonum/stat/distuv"

	"example.com/coolward/internal/fit"
	"example.com/coolward/internal/ode"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/derivation"
)

// A SurfaceFit asks for the emissivity or the coefficient of convection of a body that loses heat by both,
//
//	C dT/dt = −A (h (T − T∞) + ε σ (T⁴ − T_s⁴)),
//
// from a log. One of the two has to be known: over a short range of temperature they do the same.
type SurfaceFit struct {
	Log          Log
	Capacity     units.HeatCapacity
	Area         units.Area
	Ambient      units.Temperature
	Surroundings units.Temperature // that the body radiates to; zero: the ambient
	Initial      units.Temperature // what is known of the temperature at the first time of the log; zero: to be found

	Find        Unknown
	Coefficient units.HeatTransferCoefficient // of convection, not below 0, if the emissivity is to be found
	Emissivity  float64                       // 0 to 1, if the coefficient is to be found

	Coverage float64 // probability of the intervals, 0.5 to 0.9999; zero means 0.95

	Sources, Notes []string // repeated unread in the derivation
}

// An Unknown says what a [SurfaceFit] is to find.
type Unknown int

const (
	// FindEmissivity finds the emissivity, with the coefficient known.
	FindEmissivity Unknown = iota
	// FindCoefficient finds the coefficient of convection, with the emissivity known.
	FindCoefficient
)

// Of the integration of one curve, K, and of the derivatives to what is found.
const (
	curveTolerance = 1e-6
	stepOfFactor   = 1e-3 // of the emissivity, or of the guess of the coefficient
	stepOfInitial  = 0.01 // K
)

// Solve finds the constant. It returns an [*units.ArgumentError] for what cannot be used, and a [*units.ConvergenceError]
// where no value fits better than its neighbours. What is found may be below 0, or an emissivity above 1: the
// readings, the capacity or what was taken as known are then wrong, and the derivation warns.
func (f SurfaceFit) Solve(ctx context.Context) (*FittedSurface, error) {
	if ctx == nil {
		return nil, &units.ArgumentError{Field: "context", Accepted: "a context, such as context.Background()"}
	}
	if err := f.check(); err != nil {
		return nil, err
	}
	f.Log, f.Sources, f.Notes = f.Log.copy(), slices.Clone(f.Sources), slices.Clone(f.Notes)
	if f.Coverage == 0 {
		f.Coverage = 0.95
	}
	if f.Surroundings == (units.Temperature{}) {
		f.Surroundings = f.Ambient
	}
	s := &FittedSurface{fit: f}
	s.seconds, s.kelvin, s.place = f.Log.present()
	free := 1
	if f.Initial == (units.Temperature{}) {
		free = 2
	}
	if len(s.seconds) <= free {
		return nil, &units.ArgumentError{Field: "log: readings", Value: fmt.Sprintf("%d that are not missing", len(s.seconds)), Accepted: fmt.Sprintf("%d or more for %d constants and their errors", free+1, free)}
	}
	guess, steps := s.guess(), []float64{stepOfFactor}
	if f.Find == FindCoefficient {
		steps[0] *= math.Abs(guess)
	}
	s.constants = []float64{guess}
	if free == 2 {
		s.constants, steps = append(s.constants, s.kelvin[0]), append(steps, stepOfInitial)
	}
	residuals, columns, err := fit.LeastSquares(func(x []float64) ([]float64, error) { return s.misses(ctx, x) }, s.constants, steps)
	if err != nil {
		return nil, &units.ConvergenceError{Method: "fit of a surface", Reason: "no value fits the readings better than its neighbours; check capacity, area and ambient", Cause: err}
	}
	return s, s.measure(residuals, columns)
}

func (f SurfaceFit) check() error {
	if err := f.Log.Check(); err != nil {
		return err
	}
	for _, err := range []error{
		units.CheckPositive("heat capacity", f.Capacity),
		units.CheckPositive("area", f.Area),
		units.CheckTemperature("ambient temperature", f.Ambient),
		units.CheckNotNegative("heat transfer coefficient", f.Coefficient),
		units.CheckNumber("emissivity", f.Emissivity, 0, 1),
	} {
		if err != nil {
			return err
		}
	}
	for _, known := range []struct {
		name string
		T    units.Temperature
	}{{"temperature of the surroundings", f.Surroundings}, {"initial temperature", f.Initial}} {
		if known.T != (units.Temperature{}) {
			if err := units.CheckTemperature(known.name, known.T); err != nil {
				return err
			}
		}
	}
	switch {
	case f.Find != FindEmissivity && f.Find != FindCoefficient:
		return &units.ArgumentError{Field: "what to find", Value: int(f.Find), Accepted: "FindEmissivity or FindCoefficient"}
	case f.Find == FindEmissivity && f.Emissivity != 0:
		return &units.ArgumentError{Field: "emissivity", Value: f.Emissivity, Accepted: "none, if it is to be found"}
	case f.Find == FindCoefficient && f.Coefficient.SI() != 0:
		return &units.ArgumentError{Field: "heat transfer coefficient", Value: f.Coefficient, Accepted: "none, if it is to be found"}
	}
	return checkCoverage(f.Coverage)
}

// guess returns where the search begins.
func (s *FittedSurface) guess() float64 {
	if s.fit.Find == FindEmissivity {
		return 0.5
	}
	// The coefficient for which the body would lose a third of its excess until the last reading.
	return max(0.4*s.fit.Capacity.SI()/s.fit.Area.SI()/s.seconds[len(s.seconds)-1], 1e-6)
}

// surface returns the exchange for a value of what is to be found. Conditions refuse an emissivity outside 0 to 1, which the
// search may pass, so that both parts are taken per unit.
func (s *FittedSurface) surface(x float64) func(kelvin float64) (float64, error) {
	h, emissivity := s.fit.Coefficient.SI(), x
	if s.fit.Find == FindCoefficient {
		h, emissivity = x, s.fit.Emissivity
	}
	black, ambient := boundary.Radiation(1, s.fit.Surroundings), s.fit.Ambient.SI()
	return func(kelvin float64) (float64, error) {
		q, err := black.Flux(units.Duration{}, units.Kelvin.Of(kelvin))
		return h*(kelvin-ambient) + emissivity*q.SI(), err
	}
}

// misses returns the curve less the readings.
func (s *FittedSurface) misses(ctx context.Context, x []float64) ([]float64, error) {
	start := s.fit.Initial.SI()
	if len(x) == 2 {
		start = x[1]
	}
	flux, perFlux := s.surface(x[0]), s.fit.Area.SI()/s.fit.Capacity.SI()
	path, err := ode.Integrate(ctx, ode.Problem{
		F: func(_, y float64) (float64, error) {
			if !(y > 0) {
				return 0, units.CheckTemperature("temperature of the body", units.Kelvin.Of(y))
			}
			q, err := flux(y)
			return -perFlux * q, err
		},
		Start: start, End: s.seconds[len(s.seconds)-1], Tolerance: curveTolerance,
	})
	if err != nil {
		return nil, err
	}
	r := make([]float64, len(s.seconds))
	for i, t := range s.seconds {
		y, ok := path.At(t)
		if !ok {
			return nil, errNotFinite
		}
		r[i] = y - s.kelvin[i]
	}
	return r, nil
}

// A FittedSurface is what a [SurfaceFit] found. It does not change, and is safe for many goroutines. The zero
// FittedSurface answers with an [*units.ArgumentError].
type FittedSurface struct {
	fit             SurfaceFit
	seconds, kelvin []float64
	place           []int
	constants       []float64 // what was found, and the initial temperature if it was to be found
	errors          []float64 // their standard errors
	deviation       float64   // K
	factor          float64   // Student's t
	test            ResidualTest
}

func (s *FittedSurface) measure(residuals []float64, columns *mat.Dense) error {
	freedom := len(residuals) - len(s.constants)
	squares := 0.0
	for _, r := range residuals {
		squares += r * r
	}
	s.deviation = max(math.Sqrt(squares/float64(freedom)), curveTolerance)
	covariance, ok := fit.Covariance(columns)
	if !ok {
		return &units.ConvergenceError{Method: "fit of a surface", Reason: "the readings do not depend on what is to be found; log for longer or from a higher temperature"}
	}
	for k := range s.constants {
		s.errors = append(s.errors, s.deviation*math.Sqrt(covariance.At(k, k)))
	}
	s.factor = distuv.StudentsT{Sigma: 1, Nu: float64(freedom)}.Quantile((1 + s.fit.Coverage) / 2)
	not := Tested{Probability: 1}
	s.test = ResidualTest{Neighbours: not, Second: not, Size: not}
	if s.deviation > curveTolerance {
		if d, p, ok := fit.DurbinWatson(residuals, columns); ok {
			s.test.DurbinWatson, s.test.Neighbours = d, Tested{true, p}
		}
	}
	return nil
}

// Emissivity returns the emissivity; if it was stated, the statement.
func (s *FittedSurface) Emissivity() (Estimate[float64, float64], error) {
	if err := s.check(); err != nil {
		return Estimate[float64, float64]{OpenLow: true, OpenHigh: true}, err
	}
	if s.fit.Find == FindCoefficient {
		x := s.fit.Emissivity
		return Estimate[float64, float64]{Value: x, Low: x, High: x}, nil
	}
	x, e := s.constants[0], s.errors[0]
	return Estimate[float64, float64]{Value: x, StandardError: e, Low: x - s.factor*e, High: x + s.factor*e}, nil
}

// Coefficient returns the coefficient of convection; if it was stated, the statement.
func (s *FittedSurface) Coefficient() (Estimate[units.HeatTransferCoefficient, units.HeatTransferCoefficient], error) {
	e := Estimate[units.HeatTransferCoefficient, units.HeatTransferCoefficient]{OpenLow: true, OpenHigh: true}
	if err := s.check(); err != nil {
		return e, err
	}
	e.OpenLow, e.OpenHigh = false, false
	if s.fit.Find == FindEmissivity {
		e.Value, e.Low, e.High = s.fit.Coefficient, s.fit.Coefficient, s.fit.Coefficient
		return e, nil
	}
	of := units.WattPerSquareMetreKelvin.Of
	x, u := s.constants[0], s.errors[0]
	e.Value, e.StandardError, e.Low, e.High = of(x), of(u), of(x-s.factor*u), of(x+s.factor*u)
	return e, nil
}

// Initial returns the temperature at the first time of the log; if it was stated, the statement.
func (s *FittedSurface) Initial() (Estimate[units.Temperature, units.TemperatureDifference], error) {
	e := Estimate[units.Temperature, units.TemperatureDifference]{OpenLow: true, OpenHigh: true}
	if err := s.check(); err != nil {
		return e, err
	}
	e = Estimate[units.Temperature, units.TemperatureDifference]{Value: s.fit.Initial, Low: s.fit.Initial, High: s.fit.Initial}
	if len(s.constants) == 2 {
		x, u := s.constants[1], s.errors[1]
		e.Value, e.StandardError = units.Kelvin.Of(x), units.KelvinDifference.Of(u)
		e.Low, e.High = units.Kelvin.Of(x-s.factor*u), units.Kelvin.Of(x+s.factor*u)
	}
	return e, nil
}

// Deviation returns the standard deviation of a reading from the curve, and the degrees of freedom it was found with.
func (s *FittedSurface) Deviation() (deviation units.TemperatureDifference, freedom int) {
	if s.check() != nil {
		return units.TemperatureDifference{}, 0
	}
	return units.KelvinDifference.Of(s.deviation), len(s.seconds) - len(s.constants)
}

// Agrees reports whether the readings agree with the model: whether neighbours are off to the same side no more
// than by chance, with a probability of 0.01 or above by the test of Durbin and Watson (see [ResidualTest]).
func (s *FittedSurface) Agrees() bool {
	return s.check() == nil && s.test.Neighbours.Probability >= doubt
}

// Derivation returns how the numbers were obtained. It is the caller's own copy.
func (s *FittedSurface) Derivation() derivation.Record {
	var r derivation.Record
	if s.check() != nil {
		return r
	}
	f := &s.fit
	r.Title = "Convection and radiation fitted to a log, C dT/dt = −A (h (T − T∞) + ε σ (T⁴ − T_s⁴))"
	r.AddNumber("n", "readings", float64(len(s.seconds)), fmt.Sprintf("%d missing", len(f.Log.Times)-len(s.seconds)))
	r.Add("C", "heat capacity", f.Capacity, "given")
	r.Add("A", "area", f.Area, "given")
	r.Add("T∞", "ambient temperature", f.Ambient, "given")
	r.Add("T_s", "temperature of the surroundings", f.Surroundings, "given, or the ambient")
	emissivity, _ := s.Emissivity()
	h, _ := s.Coefficient()
	if f.Find == FindEmissivity {
		r.Add("h", "coefficient of convection", f.Coefficient, "given")
		r.AddNumber("ε", "emissivity", emissivity.Value, "found")
		r.AddNumber("u(ε)", "standard error, emissivity", emissivity.StandardError, "")
		r.AddNumber("ε_low", "low, emissivity", emissivity.Low, "")
		r.AddNumber("ε_high", "high, emissivity", emissivity.High, "")
	} else {
		r.AddNumber("ε", "emissivity", f.Emissivity, "given")
		addEstimate(&r, "h", "coefficient of convection", "found", h, true)
	}
	if T, err := s.Initial(); err == nil {
		addEstimate(&r, "T0", "initial temperature", "given or found", T, len(s.constants) == 2)
	}
	deviation, freedom := s.Deviation()
	r.Add("s", "standard deviation of a reading", deviation, "found")
	r.AddNumber("ν", "degrees of freedom", float64(freedom), "readings less constants")
	if s.test.Neighbours.Done {
		r.AddNumber("d", "Durbin-Watson statistic", s.test.DurbinWatson, "near 2 for independent errors")
		r.AddNumber("p_neighbours", "its probability", s.test.Neighbours.Probability, "if the model holds")
	}
	r.Note(fmt.Sprintf("intervals for a probability of %g, symmetric, by Student's t", f.Coverage))
	r.Source("fit: D. W. Marquardt, J. Soc. Indust. Appl. Math. 11 (1963) 431–441 (from memory)")
	if !s.Agrees() {
		r.Warn("the model does not describe these readings; what was found is not to be trusted")
	}
	if s.constants[0] < 0 || f.Find == FindEmissivity && s.constants[0] > 1 {
		r.Warn("no surface has what was found: capacity, area, ambient or what was taken as known are wrong")
	}
	for _, text := range f.Sources {
		r.Source(text)
	}
	for _, text := range f.Notes {
		r.Note(text)
	}
	return r
}

func (s *FittedSurface) check() error {
	if s == nil || len(s.errors) == 0 {
		return &units.ArgumentError{Field: "fitted surface", Accepted: "one that SurfaceFit.Solve returned"}
	}
	return nil
}
