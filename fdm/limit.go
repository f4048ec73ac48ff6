package fdm

import (
	"errors"
	"math"

	"example.com/coolward/internal/fv"
	"example.com/coolward/internal/root"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
)

// A limit is what the body tends to.
type limit struct {
	temperature float64   // K, of the whole body
	state       []float64 // of a body that does not tend to one temperature; nil else
	open        bool      // there is none within the range of the material; the end of it stands instead
	failure     error     // of a function, which leaves the limit unknown
	fixed       bool      // it does not depend on when the solution ends
}

// at returns the limit at a probe.
func (l *limit) at(tr *track, p *probe) float64 {
	if l.state == nil {
		return l.temperature
	}
	if p.kind == ofMean {
		// The sums of the heat that was exchanged have no limit.
		sum := 0.0
		for i := range tr.system.Grid.Nodes {
			sum += l.state[tr.system.Index(i)]
		}
		return tr.system.MeanTemperature(fv.Latest, sum)
	}
	return tr.read(p, fv.Latest, func(i int) float64 { return l.state[i] })
}

// findLimit finds what the body tends to if conditions stay as at the end of the solution. A body with one face
// tends to one temperature, at which no heat flows there: that which the condition states, or the nearest to
// the mean of the body in the direction in which that changes. Any other tends to a steady state.
func (s *Solution) findLimit() {
	p := s.problem
	s.limit = limit{fixed: p.steady() && p.byConstants()}
	if p.Source != nil || p.Profile != nil || p.SurfaceLump != nil || p.OppositeLump != nil || p.exchanges(false) && !s.wall.half {
		s.steadyState()
		return
	}
	if h, _, ok := p.Surface.Constants(); ok && h.SI() == 0 {
		s.limit.temperature = s.start.SI()
		return
	}
	if rest, ok := p.Surface.Rest(); ok {
		s.limit.temperature = rest.SI()
		return
	}
	if course, ok := p.Surface.SurfaceCourse(); ok {
		T, err := course.At(s.Horizon())
		s.limit.temperature, s.limit.failure = T.SI(), err
		return
	}
	s.searchLimit(p.Surface)
}

// byConstants reports whether all conditions are stated by constants.
func (p Problem) byConstants() bool {
	for _, c := range p.conditions() {
		if !c.ByConstants() {
			return false
		}
	}
	return true
}

// searchLimit looks for a temperature without exchange, as far as the material goes.
func (s *Solution) searchLimit(c boundary.Condition) {
	end := s.Horizon()
	flux := func(T float64) (float64, error) {
		q, err := c.Flux(end, units.Kelvin.Of(T))
		return q.SI(), err
	}
	low, high := s.supported()
	from := s.fine.system.MeanTemperature(fv.Latest, s.fine.value(s.fine.system.Content(), end.SI()))
	from = min(max(from, low), high) // it may lie beyond an end by the tolerance
	edge := low
	if q, err := flux(from); err == nil && q < 0 {
		edge = high
	}
	at, found, err := root.Seek(flux, from, edge, firstSearch, limitError)
	s.limit.temperature, s.limit.open, s.limit.failure = at, err == nil && !found, err
}

const (
	firstSearch = 1.0  // K, the first step of the search
	limitError  = 1e-9 // K
)

// supported returns the temperatures that all layers support.
func (s *Solution) supported() (low, high float64) {
	low, high = 0, math.Inf(1)
	for _, l := range s.wall.layers {
		a, b := supported(l.Material, s.start)
		low, high = max(low, a), min(high, b)
	}
	return low, high
}

const (
	mostLimitSteps = 400
	limitFirst     = 1e-2 // of the horizon, the first step towards the steady state
	limitLast      = 1e12 // of the horizon, a step that leaves nothing to change
	limitGrowth    = 4.0
	limitShrink    = 0.1
)

// steadyState steps from the end of the solution towards the steady state with the conditions of that time,
// by implicit steps that grow without end.
func (s *Solution) steadyState() {
	y, l := s.fine.system, &s.limit
	h := s.fine.history
	end := s.fine.end
	k, fraction := h.Find(end)
	state := make([]float64, len(h.State(0)))
	for i := range state {
		state[i] = h.Value(k, fraction, i)
	}
	n := len(state)
	f, ft, change, next := make([]float64, n), make([]float64, n), make([]float64, n), make([]float64, n)
	step := limitFirst * s.problem.Horizon.SI()
	for range mostLimitSteps {
		if err := y.Linearise(end, limitFirst*end, state, f, ft); err != nil {
			l.state, l.failure = state, causeOf(err)
			return
		}
		y.Factor(1 / step)
		copy(change, f)
		y.Solve(change)
		size := y.Norm(change)
		for i := range next {
			next[i] = state[i] + change[i]
		}
		var left *fv.RangeError
		if err := y.Check(next); errors.As(err, &left) || math.IsNaN(size) {
			if step < 1e-6*s.problem.Horizon.SI() {
				l.state, l.open = state, true
				return
			}
			step *= limitShrink
			continue
		}
		state, next = next, state
		if size < 1e-6 && step > limitLast*s.problem.Horizon.SI() {
			l.state = state
			return
		}
		step *= limitGrowth
	}
	l.state, l.open = state, true
}

// causeOf returns what made a function fail.
func causeOf(err error) error {
	var f *fv.FunctionError
	if errors.As(err, &f) {
		return f.Cause
	}
	return err
}
