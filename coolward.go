// Package coolward answers how hot a body is, where, after how long, and how sure that is.
//
// A [Problem] states a body, its material, its start and what happens at its faces. [Problem.Solve]
// takes the cheapest model that is good enough for the accuracy wanted, and says why:
//
//   - one temperature for the whole body (package lumped), if the bound on what that neglects is within the
//     accuracy;
//   - the exact series (package series), if properties, coefficients and sources are constant, while the ambient
//     may go with time;
//   - finite volumes (package fdm) in every other case: properties that vary, layers, latent heat, any
//     exchange, lumps at a face.
//
// Where properties or an exchange vary and one temperature is not good enough, heat must flow along one
// coordinate: in a sphere, a plate, a long cylinder, solid or hollow.
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
	"slices"
	"strings"

	"example.com/coolward/fdm"
	"example.com/coolward/lumped"
	"example.com/coolward/series"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/derivation"
	"example.com/coolward/units/shape"
)

// A Material is what a body is made of; every solid of package props is one. It must be safe for many
// goroutines. If it has a method IsConstant() bool, true says that neither conductivity nor specific heat
// depends on temperature; if it has Name() string and Source() string, the derivation names it and its source.
// The solids of props have all three.
type Material = fdm.Material

// A Problem is a body that exchanges heat through its surface.
type Problem struct {
	Body shape.Body

	// Material is what the whole body is made of. A body of several materials has Layers instead, from
	// the surface inwards.
	Material Material
	Layers   []fdm.Layer

	Initial units.Temperature // of the whole body, unless there is a Profile; above 0 K
	// Profile gives the temperature at the start at a depth below the surface, instead of Initial.
	Profile shape.Profile

	// Surface is what happens at the surface, Opposite at the face across the wall: the back of a plate,
	// the inside of a hollow body. The zero Opposite is what Surface says if that face is exposed, and
	// insulation if not.
	Surface, Opposite boundary.Condition

	// SurfaceLump and OppositeLump are bodies of one temperature at the faces, such as liquid in a pot;
	// nil: none.
	SurfaceLump, OppositeLump *fdm.Lump

	// Source is the heat that is set free per volume; SourceAt, if it is set, gives it by depth, time and
	// temperature instead.
	Source   units.HeatSource
	SourceAt func(depth units.Length, t units.Duration, T units.Temperature) (units.HeatSource, error)

	// Accuracy is the error of temperature that the model may add, 1 µK to 100 K; zero means 0.5 K. One
	// temperature is taken only if its error is within the accuracy at every place and time; finite volumes are judged by
	// their estimate at surface, centre and mean, from a Fourier number of 1e-4 on. It is about the
	// model alone: the scatter of a correlation is usually far larger.
	Accuracy units.TemperatureDifference

	// Horizon is how long to look ahead. It is needed unless the material, the faces and the source are
	// stated by constants that do not go with time or temperature; then the answer holds for all time.
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
	p.cite()
	s := &Solution{accuracy: accuracy, title: p.title(), hottest: p.hottest(), warnings: slices.Clone(p.Warnings)}
	if why := p.notLumped(); why != "" {
		s.reason = why
	} else {
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
			if lump.LumpingErrorIsBound() {
				s.reason = fmt.Sprintf("one temperature errs by %s at most, %s allowed", kelvins(total), kelvins(accuracy))
			}
			p.noteHottest(s)
			return s, nil
		}
		s.reason = fmt.Sprintf("one temperature may err by %s, %s allowed", kelvins(s.lumping), kelvins(accuracy))
	}
	why := p.notExact()
	if why == "" {
		err := p.series(ctx, s)
		if err == nil || !p.moving() {
			s.reason += "; properties, coefficients and sources are constant"
			return s.with(err)
		}
		why = "the series does not follow this ambient" // one that oscillates too fast for it
	}
	s.reason += "; " + why
	if p.Body.Family() == shape.Compact {
		return nil, &units.ArgumentError{
			Field: "body", Value: p.Body,
			Accepted: "a solid or hollow sphere, a plate, or a cylinder or tube whose ends are not exposed, since " + s.reason,
		}
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

// conditions returns those of both faces.
func (p Problem) conditions() []boundary.Condition {
	if p.Opposite.IsZero() {
		return []boundary.Condition{p.Surface}
	}
	return []boundary.Condition{p.Surface, p.Opposite}
}

// notLumped says why one temperature cannot be looked at, and nothing if it can.
func (p Problem) notLumped() string {
	for _, c := range p.conditions() {
		if _, ok := c.SurfaceCourse(); ok {
			return "the temperature of a face is given"
		}
	}
	switch {
	case len(p.Layers) > 0:
		return "there are layers"
	case p.Profile != nil:
		return "the start is not at one temperature"
	case p.SurfaceLump != nil || p.OppositeLump != nil:
		return "there is a lump at a face"
	case p.SourceAt != nil:
		return "the source varies"
	}
	return ""
}

// notExact says why the series is not the answer, and nothing if it is.
func (p Problem) notExact() string {
	switch {
	case len(p.Layers) > 0:
		return "the series has one material"
	case p.SurfaceLump != nil || p.OppositeLump != nil:
		return "the series knows no lumps"
	case p.SourceAt != nil:
		return "the series knows sources of constant strength"
	}
	for _, c := range p.conditions() {
		_, _, constant := c.Constants()
		_, _, following := c.Following()
		_, held := c.SurfaceCourse()
		_, flux := c.ConstantFlux()
		if !constant && !following && !held && !flux {
			return "h varies"
		}
	}
	if !isConstant(p.Material) {
		return "properties vary"
	}
	if solid := p.Body.InnerDiameter().SI() == 0; p.moving() && (!solid || p.Profile != nil || p.Source.SI() != 0 || !p.Opposite.IsZero()) {
		return "the series follows an ambient at the surface of a solid body, without a source, from one temperature"
	}
	if p.Body.Family() == shape.Compact && (p.Profile != nil || p.Source.SI() != 0 || !p.Opposite.IsZero()) {
		return "the series takes a source, a profile or a second condition along one coordinate only"
	}
	return ""
}

// moving reports whether the ambient or the temperature of a face goes with time, by a course.
func (p Problem) moving() bool {
	return slices.ContainsFunc(p.conditions(), boundary.Condition.Moves)
}

func isConstant(m Material) bool {
	c, ok := m.(interface{ IsConstant() bool })
	return ok && c.IsConstant()
}

// check returns the accuracy wanted, or what is wrong with the problem.
func (p Problem) check() (units.TemperatureDifference, error) {
	accuracy := p.Accuracy
	if accuracy == (units.TemperatureDifference{}) {
		accuracy = units.KelvinDifference.Of(0.5)
	}
	for _, err := range []error{
		p.Body.Check(),
		p.checkMaterial(),
		p.checkStart(),
		p.checkFaces(),
		checkAccuracy(accuracy),
		units.CheckFinite("source", p.Source),
		units.CheckNotNegative("horizon", p.Horizon),
	} {
		if err != nil {
			return accuracy, err
		}
	}
	if p.SourceAt != nil && p.Source.SI() != 0 {
		return accuracy, &units.ArgumentError{Field: "source", Value: p.Source, Accepted: "0 beside SourceAt"}
	}
	why := p.notExact()
	if why == "" && p.moving() {
		why = "the ambient goes with time"
	}
	if why != "" && p.Horizon.SI() == 0 {
		return accuracy, &units.ArgumentError{Field: "horizon", Value: p.Horizon, Accepted: "above 0 s, since " + why}
	}
	return accuracy, nil
}

func (p Problem) checkMaterial() error {
	switch {
	case p.Material == nil && len(p.Layers) == 0:
		return &units.ArgumentError{Field: "material", Accepted: "a material, such as props.CarbonSteel(), or layers"}
	case p.Material != nil && len(p.Layers) > 0:
		return &units.ArgumentError{Field: "material", Value: "a material beside layers", Accepted: "one of both"}
	}
	return nil
}

func (p Problem) checkStart() error {
	if p.Profile == nil {
		return units.CheckTemperature("initial temperature", p.Initial)
	}
	if p.Initial != (units.Temperature{}) {
		return &units.ArgumentError{Field: "initial temperature", Value: p.Initial, Accepted: "none beside a profile"}
	}
	return nil
}

func (p Problem) checkFaces() error {
	if !p.Surface.IsZero() || p.SurfaceLump == nil {
		if err := p.Surface.Check(); err != nil {
			return err
		}
	}
	if !p.Opposite.IsZero() {
		return p.Opposite.Check()
	}
	return nil
}

func checkAccuracy(d units.TemperatureDifference) error {
	if d.SI() >= 1e-6 && d.SI() <= 100 {
		return nil
	}
	return &units.ArgumentError{Field: "accuracy", Value: d, Accepted: "1 µK to 100 K, or 0 K for 0.5 K"}
}

// cite adds the sources of the materials to those of the problem.
func (p *Problem) cite() {
	p.Sources = slices.Clone(p.Sources)
	for _, m := range p.materials() {
		cited, ok := m.(interface{ Source() string })
		if !ok || cited.Source() == "" {
			continue
		}
		if source := "material: " + cited.Source(); !slices.Contains(p.Sources, source) {
			p.Sources = append(p.Sources, source)
		}
	}
}

func (p Problem) materials() []Material {
	if p.Material != nil {
		return []Material{p.Material}
	}
	var all []Material
	for _, l := range p.Layers {
		all = append(all, l.Material)
	}
	return all
}

func (p Problem) title() string {
	var names []string
	for _, m := range p.materials() {
		if named, ok := m.(interface{ Name() string }); ok {
			names = append(names, named.Name())
		}
	}
	title := p.Body.String()
	if len(names) > 0 {
		title += " of " + strings.Join(names, ", ")
	}
	if p.Profile == nil {
		title += ", from " + p.Initial.String()
	}
	return title
}

// start returns the temperature of the surface at the start.
func (p Problem) start() (units.Temperature, error) {
	if p.Profile == nil {
		return p.Initial, nil
	}
	return p.Profile(units.Length{})
}

// hottest returns the highest of the temperatures that the problem states.
func (p Problem) hottest() units.Temperature {
	hottest, _ := p.start() // a profile that fails is found by the model
	for _, c := range p.conditions() {
		for _, part := range c.Parts() {
			if rest, ok := part.Rest(); ok && rest.Compare(hottest) > 0 {
				hottest = rest
			}
		}
	}
	return hottest
}

func (p Problem) lumped(ctx context.Context) (*lumped.Solution, error) {
	return lumped.Problem{
		Body: p.Body, Material: p.Material, Initial: p.Initial, Surface: p.Surface, Opposite: p.Opposite, Source: p.Source,
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
	at, err := p.start()
	if err != nil {
		return err
	}
	k, err := p.Material.Conductivity(at)
	if err != nil {
		return err
	}
	c, err := p.Material.SpecificHeat(at)
	if err != nil {
		return err
	}
	exact, err := series.Problem{
		Body: p.Body, Conductivity: k, Density: p.Material.Density(), SpecificHeat: c,
		Initial: p.Initial, Profile: p.Profile, Surface: p.Surface, Opposite: p.Opposite, Source: p.Source,
		Sources: p.Sources, Notes: p.Notes,
	}.Solve(ctx)
	if err != nil {
		return err
	}
	s.solver, s.model = exact, Series
	s.bound, err = exact.TruncationError(units.Duration{})
	return err
}

// finiteVolumes answers with finite volumes, on the grid that the accuracy asks for.
func (p Problem) finiteVolumes(ctx context.Context, s *Solution) error {
	wanted := s.accuracy
	if loosest := units.KelvinDifference.Of(10); wanted.Compare(loosest) > 0 { // for package fdm
		wanted = loosest
	}
	fine, err := fdm.Problem{
		Body: p.Body, Material: p.Material, Layers: p.Layers, Initial: p.Initial, Profile: p.Profile,
		Surface: p.Surface, Opposite: p.Opposite, SurfaceLump: p.SurfaceLump, OppositeLump: p.OppositeLump, Source: p.source(),
		Horizon: p.Horizon, Until: p.Until, Accuracy: wanted, Sources: p.Sources, Notes: p.Notes,
	}.Solve(ctx)
	if err != nil {
		return err
	}
	s.solver, s.model = fine, FiniteVolumes
	if s.bound, err = fine.LargestError(); err != nil {
		return err
	}
	p.noteHottest(s)
	return nil
}

// source returns the source as a function, and nil for none.
func (p Problem) source() func(units.Length, units.Duration, units.Temperature) (units.HeatSource, error) {
	if p.SourceAt != nil || p.Source.SI() == 0 {
		return p.SourceAt
	}
	return func(units.Length, units.Duration, units.Temperature) (units.HeatSource, error) { return p.Source, nil }
}

// noteHottest looks whether an exchange function heats the body, for the warning of hot surfaces: where
// it is at the end of the horizon, or on its way at Until.
func (p Problem) noteHottest(s *Solution) {
	if p.notExact() == "" && !p.moving() {
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
