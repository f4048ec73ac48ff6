package fdm

import (
	"math"
	"slices"

	"example.com/coolward/internal/root"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// TimeTo returns the first time at which a place is at the target, to 1e-12 of a step on the
// solution as computed. A target that is met at the start is reached at 0: the start itself, or one
// on the far side of the start from the limit (a cooling body is below it already) towards which the
// place never went. For shape.Slowest and shape.Fastest it is the time of the last and the first node to
// reach the target.
//
// It returns a [*units.NeverError] if the place tends to a limit that is not beyond the target by more
// than the tolerance of a step, and a [*units.HorizonError] if the limit lies beyond the target but the
// solution ends before. The limit is that of the constants of the faces. For a function it is where q = 0 if
// conditions stay as at the end of the solution, the nearest to the mean of the body in the direction of
// flow; if there is no such temperature within the range of the material, the end of that range stands
// in the error, and none is called never. A body with two faces, a source, a profile or a lump has a limit
// for each place. If the limit cannot be found because a function
// fails, the error is a [*units.ConvergenceError] with that cause. A [*units.ArgumentError] reports a
// place that is not in the body, or a target that cannot be.
func (s *Solution) TimeTo(place shape.Place, target units.Temperature) (units.Duration, error) {
	if err := s.check(); err != nil {
		return units.Duration{}, err
	}
	if err := units.CheckTemperature("target", target); err != nil {
		return units.Duration{}, err
	}
	if place.IsSlowest() || place.IsFastest() {
		return s.timeOfNodes(place, target)
	}
	g, err := s.gauge(place)
	if err != nil {
		return units.Duration{}, err
	}
	return s.timeTo(place.String(), &g, target)
}

// LumpTimeTo returns the first time at which the lump at a face, shape.Surface or shape.Opposite, is at the
// target, as [Solution.TimeTo] does for a place.
func (s *Solution) LumpTimeTo(face shape.Place, target units.Temperature) (units.Duration, error) {
	if err := s.check(); err != nil {
		return units.Duration{}, err
	}
	if err := units.CheckTemperature("target", target); err != nil {
		return units.Duration{}, err
	}
	g, err := s.lumpGauge(face)
	if err != nil {
		return units.Duration{}, err
	}
	return s.timeTo("lump at the "+face.String(), &g, target)
}

// timeOfNodes returns the time of the last or the first node.
func (s *Solution) timeOfNodes(place shape.Place, target units.Temperature) (units.Duration, error) {
	var best units.Duration
	var failure error
	found := false
	for i := range s.fine.system.Grid.Nodes {
		g := s.nodeGauge(i)
		t, err := s.timeTo(place.String(), &g, target)
		switch {
		case err != nil && place.IsSlowest():
			return units.Duration{}, err
		case err != nil:
			failure = err
		case !found || (t.SI() > best.SI()) == place.IsSlowest():
			best, found = t, true
		}
	}
	if !found {
		return units.Duration{}, failure
	}
	return best, nil
}

func (s *Solution) timeTo(name string, g *gauge, target units.Temperature) (units.Duration, error) {
	start := s.at(g, 0)
	if target.SI() == start {
		return units.Duration{}, nil
	}
	if t, ok := s.crossing(g, target.SI(), start); ok && !s.onlyTendsTo(g, target) {
		return units.Second.Of(t), nil
	}
	return units.Duration{}, s.notReached(name, g, target)
}

// atLimit is how near to the limit a target counts as the limit, in kelvin.
const atLimit = 1e-3

// onlyTendsTo reports whether the target is the limit, and the place does not go beyond it by more than the
// tolerance. Where such a place crosses the target is an accident of the steps.
func (s *Solution) onlyTendsTo(g *gauge, target units.Temperature) bool {
	tolerance, start := s.problem.tolerance(), s.at(g, 0)
	if s.limit.open || s.limit.failure != nil || math.Abs(target.SI()-s.limit.at(s.fine, &g.fine)) > atLimit {
		return false
	}
	_, beyond := s.crossing(g, target.SI()+math.Copysign(tolerance, target.SI()-start), start)
	return !beyond
}

// notReached returns the answer for a target that the place does not cross: nil if it is met at the
// start.
func (s *Solution) notReached(name string, g *gauge, target units.Temperature) error {
	if s.limit.failure != nil {
		return &units.ConvergenceError{
			Method: "limit temperature of the exchange", Time: s.Horizon(),
			Reason: "not reached until then, and the exchange function fails on the way on; take a longer horizon", Cause: s.limit.failure,
		}
	}
	start, limit := s.at(g, 0), s.limit.at(s.fine, &g.fine)
	ahead := target.SI() - start
	if ahead*(limit-start) < 0 {
		if _, went := s.crossing(g, start+math.Copysign(s.problem.tolerance(), ahead), start); !went {
			return nil
		}
	}
	if ahead*(limit-target.SI()) > 0 && !s.onlyTendsTo(g, target) || (s.limit.open && ahead*(limit-start) > 0) {
		return &units.HorizonError{
			Place: name, Target: target, Horizon: s.Horizon(),
			Reached: units.Kelvin.Of(s.at(g, s.fine.end)), Limit: units.Kelvin.Of(limit),
		}
	}
	never := &units.NeverError{Place: name, Target: target, Limit: units.Kelvin.Of(limit)}
	if !s.limit.fixed {
		never.Condition = "if conditions stay as at " + s.Horizon().String()
	}
	return never
}

// crossing returns the first time at which the probe is at the target, which is not start.
func (s *Solution) crossing(g *gauge, target, start float64) (float64, bool) {
	tr := s.fine
	h := tr.history
	last := start - target
	for k := range h.Steps() {
		if h.Time(k) > tr.end {
			break
		}
		var points [36]float64
		ends := s.turns(g, k, points[:0])
		from := 0.0
		for _, to := range ends {
			now := s.temperature(g, k, to) - target
			if now == 0 || (now > 0) != (last > 0) {
				t0, length := h.Time(k), h.Time(k+1)-h.Time(k)
				fraction, ok := root.Find(func(f float64) float64 { return s.temperature(g, k, f) - target }, from, to, 1e-13)
				if !ok { // equal signs by rounding at a point just evaluated
					fraction = to
				}
				t := t0 + fraction*length
				if k == h.Steps()-1 && fraction == 1 {
					t = h.Time(k + 1)
				}
				return min(t, h.Time(k+1)), t <= tr.end
			}
			last, from = now, to
		}
	}
	return 0, false
}

// turns appends the fractions of step k between which the temperature at a gauge rises or falls
// throughout on each grid, in rising order and with 1 at the end.
func (s *Solution) turns(g *gauge, k int, ends []float64) []float64 {
	ends = s.fine.turns(&g.fine, k, ends)
	if s.weight != 0 && k < s.coarse.history.Steps() && s.coarse.history.Time(k) == s.fine.history.Time(k) {
		ends = s.coarse.turns(&g.coarse, k, ends)
		slices.Sort(ends)
	}
	return append(ends, 1)
}

// turns appends them of one run.
func (tr *track) turns(p *probe, k int, turns []float64) []float64 {
	own := len(turns)
	ends := turns[own:]
	if p.kind != ofPlace {
		ends = turnsOf(tr.cubic(p.content, k), ends)
	}
	for j := range p.count {
		ends = turnsOf(tr.history.Cubic(k, tr.system.Index(p.first+j)), ends)
	}
	slices.Sort(ends)
	if p.count > 1 && len(ends) > 0 {
		ends = tr.turnsBetween(p, k, ends)
	}
	return append(turns, ends...)
}

// turnsOf appends where the derivative of a polynomial, 3 c3 s² + 2 c2 s + c1, is zero, by the form without
// cancellation.
func turnsOf(c [4]float64, ends []float64) []float64 {
	d := c[2]*c[2] - 3*c[3]*c[1]
	if !(d > 0) {
		return ends
	}
	q := -(c[2] + math.Copysign(math.Sqrt(d), c[2]))
	for _, s := range [2]float64{q / (3 * c[3]), c[1] / q} {
		if s > 0 && s < 1 {
			ends = append(ends, s)
		}
	}
	return ends
}

// turnsBetween adds to the turns of the nodes around a probe those of the temperature between them.
func (tr *track) turnsBetween(p *probe, k int, ends []float64) []float64 {
	var cubics [4][4]float64
	for j := range p.count {
		cubics[j] = tr.history.Cubic(k, tr.system.Index(p.first+j))
	}
	rate := func(s float64) float64 {
		sum := 0.0
		for j, c := range cubics[:p.count] {
			e := c[0] + s*(c[1]+s*(c[2]+s*c[3]))
			sum += p.w[j] * tr.system.NodeSlope(p.first+j, k, e) * (c[1] + s*(2*c[2]+s*3*c[3]))
		}
		return sum
	}
	from, nodes := 0.0, len(ends)
	for i := range nodes + 1 {
		to := 1.0
		if i < nodes {
			to = ends[i]
		}
		if s, ok := root.Find(rate, from, to, 1e-9); ok && s > 0 && s < 1 {
			ends = append(ends, s)
		}
		from = to
	}
	slices.Sort(ends)
	return ends
}
