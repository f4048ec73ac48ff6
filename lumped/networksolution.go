package lumped

import (
	"fmt"
	"math"
	"slices"

	"example.com/coolward/internal/linear"
	"example.com/coolward/units"
)

// A NetworkSolution is the temperatures of the nodes over time. It does not change, and is safe for
// many goroutines. [Network.Solve] makes one; the zero NetworkSolution answers with an
// [*units.ArgumentError].
type NetworkSolution struct {
	network   Network
	wiring    *wiring
	end       float64 // s
	stretches []stretch

	modes      *linear.Modes // of the closed form
	reference  float64       // what its temperatures are counted from, K
	steps      int           // of the integration
	limit      []float64     // what the nodes tend to, K
	limitKnown bool
	limitError error
}

// At returns the temperature of a node at time t. It returns an [*units.ArgumentError] for a name that is not
// that of a node, for a time below zero or beyond what was solved for, and where a node that loses
// power for ever would be at 0 K.
func (s *NetworkSolution) At(node string, t units.Duration) (units.Temperature, error) {
	i, err := s.find(node, t)
	if err != nil {
		return units.Temperature{}, err
	}
	T := units.Kelvin.Of(s.kelvin(i, t.SI()))
	return T, units.CheckTemperature("temperature of "+node, T)
}

// Mean returns the mean temperature of the nodes by heat capacity. Its errors are those of At.
func (s *NetworkSolution) Mean(t units.Duration) (units.Temperature, error) {
	if err := s.check(t); err != nil {
		return units.Temperature{}, err
	}
	sum, total := 0.0, 0.0
	for i, c := range s.wiring.system.Capacity {
		sum += c * s.kelvin(i, t.SI())
		total += c
	}
	T := units.Kelvin.Of(sum / total)
	return T, units.CheckTemperature("mean temperature", T)
}

// HeatReleased returns the heat that has left the network for its surroundings until time t: the fall of the heat
// that its nodes hold, and what was set free in them. It is negative if the network has taken up
// heat. Its errors are those of At.
func (s *NetworkSolution) HeatReleased(t units.Duration) (units.Energy, error) {
	if err := s.check(t); err != nil {
		return units.Energy{}, err
	}
	sum := 0.0
	for i, c := range s.wiring.system.Capacity {
		sum += c*(s.wiring.start[i]-s.kelvin(i, t.SI())) + s.network.Nodes[i].Power.SI()*t.SI()
	}
	heat := units.Joule.Of(sum)
	return heat, units.CheckFinite("heat released", heat)
}

// TimeTo returns when a node is first at the target; it may pass it again later. A target that is met at the start is
// reached at 0: the start itself, or one that the node is beyond already and does not come back to.
//
// It returns a [*units.NeverError] if the node tends to a limit that does not pass the target, and does not pass it
// on the way; and a [*units.HorizonError] if the limit lies beyond the target but the solution ends before.
// Where surroundings change or an exchange was integrated, the limit is that for conditions that stay as at the
// horizon. If none was found, the error is a [*units.ConvergenceError]. An [*units.ArgumentError] reports a
// name that is not that of a node, or a target that cannot be.
func (s *NetworkSolution) TimeTo(node string, target units.Temperature) (units.Duration, error) {
	i, err := s.find(node, units.Duration{})
	if err != nil {
		return units.Duration{}, err
	}
	if err := units.CheckTemperature("target", target); err != nil {
		return units.Duration{}, err
	}
	start := s.wiring.start[i]
	if target.SI() == start {
		return units.Duration{}, nil
	}
	if t, ok := s.crossing(i, target.SI()); ok && !s.onlyTendsTo(i, target.SI()) {
		return units.Second.Of(t), nil
	}
	return units.Duration{}, s.notReached(i, target)
}

func (s *NetworkSolution) crossing(i int, kelvin float64) (float64, bool) {
	for k, part := range s.stretches {
		length := part.to - part.from
		if k == 0 && s.wiring.steady() {
			length = math.Inf(1)
		}
		if t, ok := part.crossing(i, kelvin, length); ok && isFinite(t) {
			return part.from + t, true
		}
	}
	return 0, false
}

// exactly is how near to the limit of the closed form a target counts as the limit, K: rounding.
const exactly = 1e-9

// onlyTendsTo reports whether the target is the limit, and the node does not go beyond it by more than the
// tolerance.
func (s *NetworkSolution) onlyTendsTo(i int, target float64) bool {
	near, tolerance := atLimit, s.network.Tolerance.SI()
	if s.modes != nil {
		near, tolerance = exactly, exactly
	}
	if s.wiring.steady() || !s.limitKnown || math.Abs(target-s.limit[i]) > near {
		return false
	}
	_, beyond := s.crossing(i, target+math.Copysign(tolerance, target-s.wiring.start[i]))
	return !beyond
}

func (s *NetworkSolution) notReached(i int, target units.Temperature) error {
	name := s.network.Nodes[i].Name
	if !s.limitKnown {
		return &units.ConvergenceError{
			Method: "limit of the network", Time: units.Second.Of(s.end), Place: name,
			Reason: "the target is not reached until then, and no limit was found; use a longer horizon", Cause: s.limitError,
		}
	}
	start, limit := s.wiring.start[i], s.limit[i]
	ahead := target.SI() - start
	if ahead*(limit-start) < 0 && ahead*s.startRate(i) <= 0 {
		return nil
	}
	if !s.wiring.steady() && ahead*(limit-target.SI()) > 0 && !s.onlyTendsTo(i, target.SI()) {
		return &units.HorizonError{
			Place: name, Target: target, Horizon: units.Second.Of(s.end),
			Reached: units.Kelvin.Of(s.kelvin(i, s.end)), Limit: units.Kelvin.Of(limit),
		}
	}
	never := &units.NeverError{Place: name, Target: target, Limit: units.Kelvin.Of(limit)}
	if !s.wiring.steady() {
		never.Condition = "if conditions stay as at " + units.Second.Of(s.end).String()
	}
	return never
}

// startRate returns dT/dt of a node at the start, or 0 if an exchange gives none.
func (s *NetworkSolution) startRate(i int) float64 {
	if c, ok := s.stretches[0].pathOfNodes.(curves); ok {
		return c.nodes[i].Slope0()
	}
	h := s.stretches[0].pathOfNodes.(steppedTrack)
	return h.Cubic(0, i)[1]
}

// TimeConstants returns the time constants of the network, the longest first. A part of the network
// without surroundings has one less than it has nodes. There are none if the network was integrated.
func (s *NetworkSolution) TimeConstants() []units.Duration {
	if s == nil || s.modes == nil {
		return nil
	}
	var list []units.Duration
	for _, rate := range s.modes.Rate {
		if rate > 0 {
			list = append(list, units.Second.Of(1/rate))
		}
	}
	slices.SortFunc(list, func(a, b units.Duration) int { return b.Compare(a) })
	return list
}

// Limit returns what a node tends to, and whether there is such a temperature: none for nodes without surroundings
// in which heat is set free. Where surroundings change or an exchange was integrated, it is that for conditions that
// stay as at the horizon.
func (s *NetworkSolution) Limit(node string) (limit units.Temperature, ok bool) {
	i, err := s.find(node, units.Duration{})
	if err != nil || !s.limitKnown || s.limit[i] == 0 || s.limit[i] == math.MaxFloat64 {
		return units.Temperature{}, false
	}
	return units.Kelvin.Of(s.limit[i]), true
}

// kelvin returns the temperature of node i, at 0 exactly the given one.
func (s *NetworkSolution) kelvin(i int, t float64) float64 {
	if t == 0 {
		return s.wiring.start[i]
	}
	k, found := slices.BinarySearchFunc(s.stretches, t, func(p stretch, t float64) int {
		if p.to < t {
			return -1
		}
		return 1
	})
	if !found && k == len(s.stretches) {
		k--
	}
	return s.stretches[k].at(i, t-s.stretches[k].from)
}

func (s *NetworkSolution) check(t units.Duration) error {
	if s == nil || s.wiring == nil {
		return &units.ArgumentError{Field: "network solution", Accepted: "one that Network.Solve returned"}
	}
	if !(t.SI() >= 0 && t.SI() <= s.end) {
		accepted := "0 s or later, finite"
		if !s.wiring.steady() {
			accepted = "0 s to " + units.Second.Of(s.end).String()
		}
		return &units.ArgumentError{Field: "time", Value: t, Accepted: accepted}
	}
	return nil
}

func (s *NetworkSolution) find(node string, t units.Duration) (int, error) {
	if err := s.check(t); err != nil {
		return 0, err
	}
	i, ok := s.wiring.index[node]
	if !ok {
		return 0, &units.ArgumentError{Field: "node", Value: fmt.Sprintf("%q", node), Accepted: "the name of a node"}
	}
	return i, nil
}
