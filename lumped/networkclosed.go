package lumped

import (
	"math"

	"example.com/coolward/internal/linear"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
)

// A stretch is a part of the solution between two bends of the surroundings, in closed form or as
// integrated.
type stretch struct {
	from, to float64 // s
	pathOfNodes
}

// A pathOfNodes gives the temperature of the nodes at a time since its start.
type pathOfNodes interface {
	at(node int, t float64) float64
	crossing(node int, kelvin, length float64) (float64, bool)
}

// curves is a pathOfNodes in closed form, in kelvin above reference.
type curves struct {
	reference float64
	nodes     []linear.Curve
}

func (c curves) at(node int, t float64) float64 { return c.reference + c.nodes[node].At(t) }

func (c curves) crossing(node int, kelvin, length float64) (float64, bool) {
	return c.nodes[node].Crossing(kelvin-c.reference, length)
}

// solveClosed prepares the sums of exponentials.
func (s *NetworkSolution) solveClosed() error {
	w := s.wiring
	modes, ok := w.system.Modes()
	if !ok {
		return &units.ArgumentError{Field: "network: conductances", Accepted: "heat capacities, and rates of conductance to capacity, not more than some 1e20 apart"}
	}
	s.modes = modes
	// The temperatures are counted from that of the first surroundings, so that a single one is the limit to
	// the last digit.
	s.reference = w.start[0]
	if len(w.leaks) > 0 {
		T, err := w.leaks[0].At(units.Duration{})
		if err != nil {
			return err
		}
		s.reference = T.SI()
	}
	above := make([]float64, len(w.start))
	for i, T := range w.start {
		above[i] = T - s.reference
	}
	sizes := modes.Sizes(&w.system, above)
	times := w.pieces(s.end)
	for k, from := range times[:len(times)-1] {
		drives, err := s.drives(from)
		if err != nil {
			return err
		}
		to := times[k+1]
		s.stretches = append(s.stretches, stretch{from, to, curves{s.reference, modes.Run(sizes, drives)}})
		if !w.steady() {
			sizes = modes.ModeAt(sizes, drives, to-from)
		}
	}
	return s.closedLimit(sizes)
}

// drives returns what acts on each node from time t on.
func (s *NetworkSolution) drives(t float64) ([]linear.Drive, error) {
	w := s.wiring
	drives := make([]linear.Drive, len(w.start))
	for i, p := range w.power {
		drives[i].Constant = p
	}
	for i, leak := range w.system.Leaks {
		g, d := leak.Conductance, &drives[leak.Node]
		course := w.leaks[i]
		if mean, amplitude, period, lag, ok := course.Oscillation(); ok {
			omega := 2 * math.Pi / period.SI()
			sin, cos := math.Sincos(omega * (t - lag.SI()))
			d.Constant += g * (mean.SI() - s.reference)
			d.Waves = append(d.Waves, linear.Wave{Omega: omega, Cos: g * amplitude.SI() * sin, Sin: g * amplitude.SI() * cos})
			continue
		}
		T, rate, err := courseAt(course, t)
		if err != nil {
			return nil, err
		}
		d.Constant += g * (T - s.reference)
		d.Slope += g * rate
	}
	for i, d := range drives {
		if err := units.CheckFinite("network: power into "+s.network.Nodes[i].Name, units.Watt.Of(d.Constant+math.Abs(d.Slope))); err != nil {
			return nil, err
		}
	}
	return drives, nil
}

func courseAt(c boundary.Course, t float64) (kelvin, rate float64, err error) {
	T, err := c.At(units.Second.Of(t))
	if err != nil {
		return 0, 0, err
	}
	r, err := c.Rate(units.Second.Of(t))
	return T.SI(), r.SI(), err
}

// closedLimit fills what each node tends to if the surroundings stay as at the end, where the modes have the given
// sizes.
func (s *NetworkSolution) closedLimit(sizes []float64) error {
	w := s.wiring
	constant := append([]float64(nil), w.power...)
	at := s.end
	if w.steady() {
		at = 0
	}
	for i, leak := range w.system.Leaks {
		T, err := w.leaks[i].At(units.Second.Of(at))
		if err != nil {
			return err
		}
		constant[leak.Node] += leak.Conductance * (T.SI() - s.reference)
	}
	rest, rise := s.modes.Rest(sizes, constant)
	s.limit = make([]float64, len(rest))
	for i := range rest {
		switch {
		case rise[i] > 0:
			s.limit[i] = math.MaxFloat64
		case rise[i] < 0:
			s.limit[i] = 0
		default:
			s.limit[i] = s.reference + rest[i]
		}
		if !isFinite(s.limit[i]) {
			return &units.ArgumentError{Field: "network: limit of " + s.network.Nodes[i].Name, Value: units.Kelvin.Of(s.limit[i]), Accepted: "a finite temperature"}
		}
	}
	s.limitKnown = true
	return nil
}
