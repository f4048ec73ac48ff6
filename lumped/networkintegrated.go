package lumped

import (
	"context"
	"errors"
	"fmt"
	"math"

	"example.com/coolward/internal/linear"
	"example.com/coolward/internal/rosenbrock"
	"example.com/coolward/units"
)

const (
	mostSteps   = 100_000
	settled     = 1e-6 // what a node may still change, K, when it is taken to be at its limit
	restingTime = 1e9  // how long, in horizons, the search for a limit waits for that
)

// steppedTrack is a pathOfNodes that was integrated.
type steppedTrack struct{ *rosenbrock.History }

func (h steppedTrack) at(node int, t float64) float64 {
	k, fraction := h.Find(t)
	return h.Value(k, fraction, node)
}

func (h steppedTrack) crossing(node int, kelvin, _ float64) (float64, bool) {
	return linear.Crossing(h.History, node, kelvin)
}

// integrate follows the temperatures from bend to bend of the surroundings.
func (s *NetworkSolution) integrate(ctx context.Context) (*NetworkSolution, error) {
	times := s.wiring.pieces(s.end)
	state := s.wiring.start
	for k, from := range times[:len(times)-1] {
		to := times[k+1]
		latest := math.Nextafter(to, 0) // at a step of the surroundings what holds before it
		system := s.dense(func(t float64) float64 { return min(from+t, latest) })
		h, statistics, err := rosenbrock.Integrate(system, state, rosenbrock.Options{
			End: to - from, MaxStep: to - from, MaxSteps: mostSteps,
			Accepted: func(float64, []float64, float64) (bool, error) { return false, ctx.Err() },
		})
		s.steps += statistics.Steps
		if h.Steps() > 0 {
			s.stretches = append(s.stretches, stretch{from, from + h.End(), steppedTrack{h}})
			state = h.State(h.Steps())
		}
		if err != nil {
			if len(s.stretches) == 0 {
				return nil, networkGivenUp(0, err)
			}
			s.end = from + h.End()
			return s, networkGivenUp(s.end, err)
		}
	}
	s.findLimit(ctx, state)
	return s, nil
}

func networkGivenUp(t float64, cause error) error {
	reason := "the exchange cannot go on"
	switch {
	case errors.Is(cause, rosenbrock.ErrSteps):
		reason = "too many steps; use a shorter horizon or a larger tolerance"
	case errors.Is(cause, rosenbrock.ErrShort):
		reason = "the steps become too short; an exchange jumps or the tolerance is too small"
	case errors.Is(cause, context.Canceled), errors.Is(cause, context.DeadlineExceeded):
		reason = "the context has ended"
	}
	return &units.ConvergenceError{Method: "network", Time: units.Second.Of(t), Reason: reason, Cause: cause}
}

// dense returns the equations of the network with the time of its surroundings as a function of the time
// of the integration.
func (s *NetworkSolution) dense(clock func(t float64) float64) *linear.Dense {
	return &linear.Dense{
		F:         func(t float64, y, f []float64) error { return s.wiring.rates(clock(t), y, f) },
		Tolerance: s.network.Tolerance.SI(),
		Valid:     s.valid,
	}
}

func (s *NetworkSolution) valid(y []float64) error {
	for i, kelvin := range y {
		if !(kelvin > 0 && isFinite(kelvin)) {
			return units.CheckTemperature("temperature of "+s.network.Nodes[i].Name, units.Kelvin.Of(kelvin))
		}
	}
	return nil
}

// rates sets f = dT/dt.
func (w *wiring) rates(t float64, y, f []float64) error {
	copy(f, w.power)
	when := units.Second.Of(t)
	for _, l := range w.system.Links {
		p := l.Conductance * (y[l.A] - y[l.B])
		f[l.A] -= p
		f[l.B] += p
	}
	for i, l := range w.system.Leaks {
		T, err := w.leaks[i].At(when)
		if err != nil {
			return err
		}
		f[l.Node] -= l.Conductance * (y[l.Node] - T.SI())
	}
	for _, link := range w.flows {
		p, err := link.watts(when, y)
		if err != nil {
			return err
		}
		f[link.from] -= p
		if link.to >= 0 {
			f[link.to] += p
		}
	}
	for _, face := range w.faces {
		q, err := face.surface.Flux(when, units.Kelvin.Of(y[face.node]))
		if err != nil {
			return err
		}
		f[face.node] -= face.area * q.SI()
	}
	for i := range f {
		f[i] /= w.system.Capacity[i]
		if !isFinite(f[i]) {
			return errNotFinite
		}
	}
	return nil
}

var errNotFinite = errors.New("a rate of change is not finite")

// watts returns the power that leaves the node from.
func (l *flow) watts(t units.Duration, y []float64) (float64, error) {
	a := units.Kelvin.Of(y[l.from])
	var b units.Temperature
	if l.to >= 0 {
		b = units.Kelvin.Of(y[l.to])
	} else {
		var err error
		if b, err = l.course.At(t); err != nil {
			return 0, err
		}
	}
	sign := 1.0
	if l.reversed {
		a, b, sign = b, a, -1
	}
	p, err := l.power(a, b)
	if err != nil {
		return 0, fmt.Errorf("%s: %w", l.name, err)
	}
	return sign * p.SI(), units.CheckFinite(l.name+": flow", p)
}

// findLimit lets conditions stay as at the end until the temperatures change no more.
func (s *NetworkSolution) findLimit(ctx context.Context, state []float64) {
	rate := make([]float64, len(state))
	frozen := s.dense(func(float64) float64 { return s.end })
	length := restingTime * s.end
	h, _, err := rosenbrock.Integrate(frozen, state, rosenbrock.Options{
		End: length, MaxStep: length, MaxSteps: mostSteps,
		Accepted: func(t float64, y []float64, _ float64) (bool, error) {
			if err := s.wiring.rates(s.end, y, rate); err != nil {
				return false, err
			}
			moving := 0.0
			for _, r := range rate {
				moving = max(moving, math.Abs(r))
			}
			s.limitKnown = t > s.end && moving*t < settled
			return s.limitKnown, ctx.Err()
		},
	})
	s.limit, s.limitError = h.State(h.Steps()), err
}
