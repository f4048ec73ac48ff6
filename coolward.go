// Package coolward answers how hot a body is, where, after how long, and how sure that is.
//
// A [Problem] states a body, its material, its start and what happens at its surface. [Problem.Solve]
// takes the cheapest model that is good enough for the accuracy wanted, and says why:
//
//   - one temperature for the whole body (package lumped), if the bound on what that neglects is within the
//     accuracy;
//   - the exact series (package series), if the properties and the coefficient are constant;
//   - finite volumes (package fdm) in every other case.
//
// Bodies are solid spheres, cylinders with insulated ends and plates; bricks and cylinders with exposed ends
// too, where properties and coefficient are constant.
//
// The three models can be used by themselves; their problems and answers have the same names. What
// happens at a surface comes from package correlations/surface, materials and fluids from props,
// bodies and places from units/shape, quantities from units.
//
// A result is a prediction from correlations with a scatter of 10 to 30 %. Surfaces may be hotter
// than predicted: nobody touches, packs or eats by a computed number alone. Local codes and licensed
// practice decide.
package coolward

import (
	"context"
	"fmt"
	"math"
	"slices"

	"example.com/coolward/fdm"
	"example.com/coolward/lumped"
	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/derivation"
	"example.com/coolward/units/shape"
)

// A Material is what a body is made of; every solid of package props is one. It must be safe for many
// goroutines. If it also has the methods Name() string and Source() string, as those have, the derivation
// names it and its source.
type Material interface {
	Density() units.Density
	Conductivity(units.Temperature) (units.Conductivity, error)
	SpecificHeat(units.Temperature) (units.SpecificHeat, error)
	Enthalpy(units.Temperature) (units.SpecificEnergy, error)
	Temperature(units.SpecificEnergy) (units.Temperature, error)
	Range() (low, high units.Temperature)
	Kinks() []units.Temperature
	IsConstant() bool // neither conductivity nor specific heat depends on temperature
}

// A Problem is a body that exchanges heat through its surface.
type Problem struct {
	Body     shape.Body
	Material Material
	Initial  units.Temperature // uniform, above 0 K

	// Surface is of boundary.Constant or boundary.Function; of boundary.Temperature too, where the
	// material is constant.
	Surface boundary.Condition

	// Accuracy is the error of temperature that the model may add, 1 µK to 100 K; zero means 0.5 K. One
	// temperature is taken only if its error is within the accuracy at every place and time; finite volumes are judged by
	// their estimate at surface, centre and mean, from a Fourier number of 1e-4 on. It is about the
	// model alone: the scatter of a correlation is usually far larger.
	Accuracy units.TemperatureDifference

	// Horizon is how long to look ahead. It is needed unless the material and the surface are
	// stated by constants; then the answer holds for all time.
	Horizon units.Duration

	// Until lets the solution end before Horizon, once the whole body has passed this temperature.
	// Zero means none.
	Until units.Temperature

	Sources, Notes, Warnings []string // repeated unread in the derivation
}

// A Model is one of the models that [Problem.Solve] chooses from.
type Model uint8

// The models, from the cheapest to the most general.
const (
	Lumped        Model = iota + 1 // one temperature for the whole body
	Series                         // exact modes, constant properties and coefficient
	FiniteVolumes                  // finite volumes on enthalpy
)

// String names the model.
func (m Model) String() string {
	switch m {
	case Lumped:
		return "lumped"
	case Series:
		return "series"
	case FiniteVolumes:
		return "finite volumes"
	}
	return "no model"
}

// A solver is what the solutions of the three models have in common.
type solver interface {
	At(place shape.Place, t units.Duration) (units.Temperature, error)
	Mean(t units.Duration) (units.Temperature, error)
	TimeTo(place shape.Place, target units.Temperature) (units.Duration, error)
	HeatReleased(t units.Duration) (units.Energy, error)
	Derivation() derivation.Record
}

// A Solution is the answer of the model that was chosen. It does not change, and is safe for many
// goroutines. The zero Solution answers with an [*units.ArgumentError].
type Solution struct {
	solver   solver
	model    Model
	reason   string
	accuracy units.TemperatureDifference
	lumping  units.TemperatureDifference
	bound    units.TemperatureDifference
	biot     lumped.Biot
	title    string
	hottest  units.Temperature
	warnings []string
}

// Solve solves the problem with the cheapest model that is good enough.
//
// It returns an [*units.ArgumentError] for a field that cannot be used, a [*units.RangeError] for
// temperatures outside the range of the material, the error of the exchange function, and a
// [*units.ConvergenceError] if a solution has to be given up.
func (p Problem) Solve(ctx context.Context) (*Solution, error) {
	accuracy, err := p.check()
	if err != nil {
		return nil, err
	}
	if cited, ok := p.Material.(interface{ Source() string }); ok && cited.Source() != "" {
		p.Sources = append(slices.Clone(p.Sources), "material: "+cited.Source())
	}
	s := &Solution{accuracy: accuracy, title: p.title(), hottest: p.Initial, warnings: slices.Clone(p.Warnings)}
	_, ambient, constant := p.Surface.Constants()
	if constant && ambient.Compare(p.Initial) > 0 {
		s.hottest = ambient
	}
	if surface, ok := p.Surface.SurfaceTemperature(); ok {
		if surface.Compare(p.Initial) > 0 {
			s.hottest = surface
		}
		s.reason = "the surface temperature is given and properties are constant"
		return s.with(p.series(ctx, s))
	}
	if p.Body.Family() == shape.Compact {
		s.reason = "heat flows along more than one coordinate; properties and h are constant"
		return s.with(p.series(ctx, s))
	}
	lump, err := p.lumped(ctx)
	if err != nil {
		return nil, err
	}
	s.biot = lump.Biot()
	if s.lumping, err = largestLumpingError(lump); err != nil {
		return nil, err
	}
	if total := s.lumping.Add(lump.IntegrationError()); total.Compare(accuracy) <= 0 {
		s.solver, s.model, s.bound = lump, Lumped, total
		s.reason = fmt.Sprintf("one temperature errs by about %s, %s allowed", kelvins(total), kelvins(accuracy))
		if constant && p.Material.IsConstant() {
			s.reason = fmt.Sprintf("one temperature errs by %s at most, %s allowed", kelvins(total), kelvins(accuracy))
		}
		p.noteHottest(s)
		return s, nil
	}
	s.reason = fmt.Sprintf("one temperature may err by %s, %s allowed; ", kelvins(s.lumping), kelvins(accuracy))
	switch {
	case constant && p.Material.IsConstant():
		s.reason += "properties and h are constant"
		return s.with(p.series(ctx, s))
	case constant:
		s.reason += "properties vary"
	default:
		s.reason += "h varies"
	}
	return s.with(p.finiteVolumes(ctx, s))
}

// with returns s, or the error in its place.
func (s *Solution) with(err error) (*Solution, error) {
	if err != nil {
		return nil, err
	}
	return s, nil
}

func kelvins(d units.TemperatureDifference) string { return d.Text(units.KelvinDifference, 3) }

// check returns the accuracy wanted, or what is wrong with the problem.
func (p Problem) check() (units.TemperatureDifference, error) {
	accuracy := p.Accuracy
	if accuracy == (units.TemperatureDifference{}) {
		accuracy = units.KelvinDifference.Of(0.5)
	}
	if p.Material == nil {
		return accuracy, &units.ArgumentError{Field: "material", Accepted: "a material, such as props.CarbonSteel()"}
	}
	_, _, constant := p.Surface.Constants()
	_, given := p.Surface.SurfaceTemperature()
	surface := p.Surface.CheckExchange
	if given {
		surface = p.Surface.Check
	}
	for _, err := range []error{
		p.Body.Check(),
		units.CheckTemperature("initial temperature", p.Initial),
		surface(),
		checkAccuracy(accuracy),
		units.CheckNotNegative("horizon", p.Horizon),
	} {
		if err != nil {
			return accuracy, err
		}
	}
	exact := (constant || given) && p.Material.IsConstant()
	switch p.Body.Family() {
	case shape.HollowSpherical, shape.HollowCylindrical:
		return accuracy, &units.ArgumentError{Field: "body", Value: p.Body, Accepted: "a solid sphere, cylinder, plate or brick"}
	case shape.Compact:
		if !exact {
			return accuracy, &units.ArgumentError{Field: "body", Value: p.Body, Accepted: "with properties or an exchange that vary: a solid sphere, a cylinder whose ends are not exposed, or a plate"}
		}
	}
	switch {
	case given && !exact:
		return accuracy, &units.ArgumentError{Field: "surface condition", Value: "a surface temperature", Accepted: "with properties that vary: boundary.Constant or boundary.Function"}
	case !exact && p.Horizon.SI() == 0:
		return accuracy, &units.ArgumentError{Field: "horizon", Value: p.Horizon, Accepted: "above 0 s, since material and surface are not both stated by constants"}
	}
	return accuracy, nil
}

func checkAccuracy(d units.TemperatureDifference) error {
	if d.SI() >= 1e-6 && d.SI() <= 100 {
		return nil
	}
	return &units.ArgumentError{Field: "accuracy", Value: d, Accepted: "1 µK to 100 K, or 0 K for 0.5 K"}
}

func (p Problem) title() string {
	of := ""
	if named, ok := p.Material.(interface{ Name() string }); ok {
		of = " of " + named.Name()
	}
	return fmt.Sprintf("%v%s, from %v", p.Body, of, p.Initial)
}

func (p Problem) lumped(ctx context.Context) (*lumped.Solution, error) {
	return lumped.Problem{
		Body: p.Body, Material: p.Material, Initial: p.Initial, Surface: p.Surface,
		Horizon: p.Horizon, Until: p.Until, Sources: p.Sources, Notes: p.Notes,
	}.Solve(ctx)
}

// largestLumpingError returns the largest bound of the places that people ask for.
func largestLumpingError(s *lumped.Solution) (largest units.TemperatureDifference, err error) {
	for _, place := range []shape.Place{shape.Surface(), shape.Centre(), shape.Mean()} {
		e, err := s.LumpingError(place)
		if err != nil {
			return e, err
		}
		if e.Compare(largest) > 0 {
			largest = e
		}
	}
	return largest, nil
}

// series answers with the exact series.
func (p Problem) series(ctx context.Context, s *Solution) error {
	k, err := p.Material.Conductivity(p.Initial)
	if err != nil {
		return err
	}
	c, err := p.Material.SpecificHeat(p.Initial)
	if err != nil {
		return err
	}
	exact, err := series.Problem{
		Body: p.Body, Conductivity: k, Density: p.Material.Density(), SpecificHeat: c,
		Initial: p.Initial, Surface: p.Surface, Sources: p.Sources, Notes: p.Notes,
	}.Solve(ctx)
	if err != nil {
		return err
	}
	s.solver, s.model = exact, Series
	s.bound, err = exact.TruncationError(units.Duration{})
	return err
}

// finiteVolumes answers with finite volumes, on finer grids until the estimated error is within the
// accuracy.
func (p Problem) finiteVolumes(ctx context.Context, s *Solution) error {
	const coarsest, finest = 50, 1600
	for cells := coarsest; ; cells *= 2 {
		fine, err := fdm.Problem{
			Body: p.Body, Material: p.Material, Initial: p.Initial, Surface: p.Surface,
			Horizon: p.Horizon, Until: p.Until, Cells: cells, Tolerance: s.accuracy.Scale(0.02),
			Sources: p.Sources, Notes: p.Notes,
		}.Solve(ctx)
		if err != nil {
			return err
		}
		s.solver, s.model = fine, FiniteVolumes
		if s.bound, err = p.largestError(fine); err != nil {
			return err
		}
		if s.bound.Compare(s.accuracy) <= 0 {
			p.noteHottest(s)
			return nil
		}
		if cells >= finest {
			return &units.ConvergenceError{
				Method: "finite volumes", Time: fine.Horizon(),
				Reason: fmt.Sprintf("the estimated error is %s with %d cells, %s allowed; take a larger accuracy", kelvins(s.bound), cells, kelvins(s.accuracy)),
			}
		}
	}
}

// noteHottest looks whether an exchange function heats the body, for the warning of hot surfaces: where
// it is at the end of the horizon, or on its way at Until.
func (p Problem) noteHottest(s *Solution) {
	if _, _, constant := p.Surface.Constants(); constant {
		return
	}
	end, err := s.solver.At(shape.Surface(), p.Horizon)
	if err != nil {
		end = p.Until // the solution ended there, before the horizon
	}
	if end.Compare(s.hottest) > 0 {
		s.hottest = end
	}
}

// largestError returns the largest estimated error at the places that people ask for, at times from a
// Fourier number of 1e-4 to the end of the solution. Before that heat has come from the outermost
// hundredth of the radius only.
func (p Problem) largestError(s *fdm.Solution) (largest units.TemperatureDifference, err error) {
	k, err := p.Material.Conductivity(p.Initial)
	if err != nil {
		return largest, err
	}
	c, err := p.Material.SpecificHeat(p.Initial)
	if err != nil {
		return largest, err
	}
	r := p.Body.ConductionLength().SI()
	const times = 24
	first := 1e-4 * r * r / units.DiffusivityOf(k, p.Material.Density(), c).SI()
	end := s.Horizon().SI()
	for i := range times + 1 {
		t := units.Second.Of(end)
		if first < end {
			t = units.Second.Of(min(end, first*math.Pow(end/first, float64(i)/times)))
		}
		for _, place := range []shape.Place{shape.Surface(), shape.Centre(), shape.Mean()} {
			e, err := s.ErrorEstimate(place, t)
			if err != nil {
				return largest, err
			}
			if e.Compare(largest) > 0 {
				largest = e
			}
		}
	}
	return largest, nil
}

// Model returns the model that was chosen.
func (s *Solution) Model() Model {
	if s == nil {
		return 0
	}
	return s.model
}

// Reason says why the model was chosen.
func (s *Solution) Reason() string {
	if s == nil {
		return ""
	}
	return s.reason
}

// Biot returns the Biot number with either length, at the largest coefficient and the least
// conductivity of the run. It is zero for a body in which heat flows along more than one coordinate, and where
// the temperature of the surface is given.
func (s *Solution) Biot() lumped.Biot {
	if s == nil {
		return lumped.Biot{}
	}
	return s.biot
}

// ModelError returns the error of temperature that the model adds: a bound if it is lumped with
// constants or the series, else an estimate for surface, centre and mean from a Fourier number of 1e-4 on. It
// says nothing of the scatter of correlations and properties.
func (s *Solution) ModelError() units.TemperatureDifference {
	if s == nil {
		return units.TemperatureDifference{}
	}
	return s.bound
}

// At returns the temperature at a place and time. Errors are those of the chosen model: an
// [*units.ArgumentError] for a place that is not in the body and for a time that was not solved for.
func (s *Solution) At(place shape.Place, t units.Duration) (units.Temperature, error) {
	if s == nil || s.solver == nil {
		return units.Temperature{}, errUnsolved()
	}
	return s.solver.At(place, t)
}

// Mean returns the mean temperature at time t, with the errors of [Solution.At].
func (s *Solution) Mean(t units.Duration) (units.Temperature, error) {
	if s == nil || s.solver == nil {
		return units.Temperature{}, errUnsolved()
	}
	return s.solver.Mean(t)
}

// TimeTo returns when the place first reaches the target. A target that is met at the start is
// reached at 0. It returns an [*units.NeverError] with the limit if the place never gets there or only
// to within 1 mK of it, and an
// [*units.HorizonError] if not within the time that was solved for.
func (s *Solution) TimeTo(place shape.Place, target units.Temperature) (units.Duration, error) {
	if s == nil || s.solver == nil {
		return units.Duration{}, errUnsolved()
	}
	return s.solver.TimeTo(place, target)
}

// HeatReleased returns the heat that has left the body until time t, negative if it has taken up heat,
// with the errors of [Solution.At].
func (s *Solution) HeatReleased(t units.Duration) (units.Energy, error) {
	if s == nil || s.solver == nil {
		return units.Energy{}, errUnsolved()
	}
	return s.solver.HeatReleased(t)
}

func errUnsolved() error {
	return &units.ArgumentError{Field: "solution", Accepted: "one that Problem.Solve returned"}
}

// burning is the surface temperature from which long contact burns skin, whatever the material: 43 °C
// for 8 h (ISO 13732-1:2006, Table 1, from memory).
func burning() units.Temperature { return units.Celsius.Of(43) }

// Derivation returns how the answer was obtained: the choice of the model, and every intermediate,
// source and warning of that model.
func (s *Solution) Derivation() derivation.Record {
	var r derivation.Record
	if s == nil || s.solver == nil {
		return r
	}
	r.Title = s.title
	r.Add("δ", "model error wanted", s.accuracy, "")
	if s.lumping.SI() > 0 {
		r.Add("δ₁", "error of one temperature for the whole body", s.lumping, "largest of surface, centre and mean")
	}
	how := "largest of surface, centre and mean"
	if s.model == FiniteVolumes {
		how += ", from Fo = 1e-4 on"
	}
	r.Add("δₘ", "error of the model that was chosen", s.bound, how)
	if s.hottest.Compare(burning()) >= 0 {
		r.Warn("hot surface: the body is at " + s.hottest.String() + " at its hottest; above " + burning().String() +
			" long contact burns skin (ISO 13732-1, from memory), so measure before anybody touches it")
	}
	for _, w := range s.warnings {
		r.Warn(w)
	}
	r.Note("model: " + s.model.String() + "; " + s.reason)
	r.Append(s.solver.Derivation())
	return r
}
