package fdm

import (
	"example.com/coolward/internal/fv"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A Solution is the history of temperatures that a [Problem] leads to. It does not change and may be
// used from many goroutines.
type Solution struct {
	problem Problem
	wall    wall
	start   units.Temperature // from which the tables count
	tables  []*fv.Table       // of each layer
	changes []fv.Change       // of each layer
	ladder
	coarseFailure error
	limit         limit
	bounds        bounds
	warnings      []string
	worst         worst
}

// Statistics counts what the run on the reported grid took, without those on coarser grids and those before a grid was chosen.
type Statistics struct {
	Cells       int // between centre and surface, or across the wall
	Steps       int // accepted
	Rejected    int // repeated with a shorter step
	Evaluations int // of the whole system of equations
}

// Horizon returns the time at which the solution ends: that of the problem, or earlier if Until was
// reached, an event happened, or an error ended it.
func (s *Solution) Horizon() units.Duration {
	if !s.made() {
		return units.Duration{}
	}
	return units.Second.Of(s.fine.end)
}

// made reports whether s comes from a problem that was solved.
func (s *Solution) made() bool { return s != nil && s.fine != nil }

// check returns an [*units.ArgumentError] for a solution that was not made by solving a problem.
func (s *Solution) check() error {
	if s.made() {
		return nil
	}
	return &units.ArgumentError{Field: "fdm.Solution", Accepted: "one that Problem.Solve returned"}
}

// At returns the temperature at a place and time, extrapolated from the grid and one with half the cells: on nodes from
// theirs, between nodes of the cubic through four of them. It may go beyond the temperatures of the start and the
// surroundings by the estimated error. Where two layers meet it is that of the outer
// one. It returns an [*units.ArgumentError] for a place that is not in the body and for a time outside
// the solution.
func (s *Solution) At(place shape.Place, t units.Duration) (units.Temperature, error) {
	if err := s.checkTime(t); err != nil {
		return units.Temperature{}, err
	}
	g, err := s.gauge(place)
	if err != nil {
		return units.Temperature{}, err
	}
	return units.Kelvin.Of(s.at(&g, t.SI())), nil
}

// Mean returns the temperature at which the body would settle if it were insulated at time t: that
// of its mean enthalpy. It is the mean over the volume if the specific heat is constant.
// The error is that of [Solution.At].
func (s *Solution) Mean(t units.Duration) (units.Temperature, error) {
	return s.At(shape.Mean(), t)
}

// LumpAt returns the temperature of the lump at a face, shape.Surface or shape.Opposite. It returns an
// [*units.ArgumentError] where there is none, and for a time outside the solution.
func (s *Solution) LumpAt(face shape.Place, t units.Duration) (units.Temperature, error) {
	if err := s.checkTime(t); err != nil {
		return units.Temperature{}, err
	}
	g, err := s.lumpGauge(face)
	if err != nil {
		return units.Temperature{}, err
	}
	return units.Kelvin.Of(s.at(&g, t.SI())), nil
}

// HeatReleased returns the heat that has left the body since the start through all faces, into lumps too; it
// is negative if heat has entered. With a source it differs from what the body has lost by
// [Solution.HeatGenerated]. It returns an [*units.ArgumentError] for a time outside the solution.
func (s *Solution) HeatReleased(t units.Duration) (units.Energy, error) {
	if err := s.checkTime(t); err != nil {
		return units.Energy{}, err
	}
	return units.Joule.Of(s.heat(t.SI())), nil
}

func (s *Solution) heat(t float64) float64 {
	return s.released(fv.Surface, t) + s.released(fv.Opposite, t)
}

// HeatThrough returns the heat that has left the body since the start through one face, shape.Surface or
// shape.Opposite. Of a plate with like faces each has half. It returns an [*units.ArgumentError] for
// another place and for a time outside the solution.
func (s *Solution) HeatThrough(face shape.Place, t units.Duration) (units.Energy, error) {
	if err := s.checkTime(t); err != nil {
		return units.Energy{}, err
	}
	name, err := s.face(face)
	if err != nil {
		return units.Energy{}, err
	}
	q := s.released(name, t.SI())
	if s.wall.half {
		q /= 2
	}
	return units.Joule.Of(q), nil
}

// face returns the name of a face of the body; the opposite face of a plate with like halves is its surface.
func (s *Solution) face(place shape.Place) (string, error) {
	name, err := faceOf(place)
	if err == nil && name == fv.Opposite {
		if !s.problem.twoFaces() {
			return "", &units.ArgumentError{Field: "face", Value: place.String(), Accepted: "shape.Surface, since " + s.problem.Body.String() + " has no opposite face"}
		}
		if s.wall.half {
			name = fv.Surface
		}
	}
	return name, err
}

// HeatGenerated returns the heat that the source has given since the start. It returns an
// [*units.ArgumentError] for a time outside the solution.
func (s *Solution) HeatGenerated(t units.Duration) (units.Energy, error) {
	if err := s.checkTime(t); err != nil {
		return units.Energy{}, err
	}
	return units.Joule.Of(s.sum((*fv.System).Generated, t.SI())), nil
}

// Flux returns the heat flux that leaves the body through a face, shape.Surface or shape.Opposite, into a
// lump too: by its condition at the temperature of the face, or, where that is prescribed, by the rate of the heat
// that leaves. It returns an [*units.ArgumentError] for another place and for a time outside the
// solution, and the error of a function.
func (s *Solution) Flux(face shape.Place, t units.Duration) (units.HeatFlux, error) {
	if err := s.checkTime(t); err != nil {
		return units.HeatFlux{}, err
	}
	name, err := s.face(face)
	if err != nil {
		return units.HeatFlux{}, err
	}
	q, err := s.fine.flux(name, t.SI())
	if err == nil && s.weight != 0 {
		var less float64
		less, err = s.coarse.flux(name, t.SI())
		q += s.weight * (q - less)
	}
	return units.WattPerSquareMetre.Of(q), err
}

// flux returns the heat flux that leaves through a face in a run.
func (tr *track) flux(name string, t float64) (float64, error) {
	h := tr.history
	k, f := h.Find(t)
	q, ok, err := tr.system.Flux(name, k, t, func(i int) float64 { return h.Value(k, f, i) })
	if err != nil || ok || h.Steps() == 0 {
		return q, err
	}
	area := tr.system.Grid.Area
	if name == fv.Opposite {
		area = tr.system.Grid.Inner
	}
	c := tr.cubic(tr.system.Released(name), k)
	return (c[1] + f*(2*c[2]+f*3*c[3])) / (h.Time(k+1) - h.Time(k)) / area, nil
}

// Statistics counts cells, steps and evaluations.
func (s *Solution) Statistics() Statistics {
	if !s.made() {
		return Statistics{}
	}
	st := s.fine.statistics
	return Statistics{s.wall.count(0), st.Steps, st.Rejected, st.Evaluations}
}

// checkTime returns an [*units.ArgumentError] for a time outside the solution.
func (s *Solution) checkTime(t units.Duration) error {
	if err := s.check(); err != nil {
		return err
	}
	if t.SI() >= 0 && t.SI() <= s.fine.end {
		return nil
	}
	return &units.ArgumentError{Field: "time", Value: t, Accepted: "0 s to " + s.Horizon().String()}
}
