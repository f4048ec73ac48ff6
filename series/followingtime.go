package series

import (
	"math"
	"math/cmplx"

	"example.com/coolward/internal/root"
	"example.com/coolward/units"
)

// A crossing looks for the first time at which a path is at a target. Over an interval what rises have done never
// decreases, nor what falls have done, so that both ends enclose the temperature in between: an interval whose enclosure
// leaves the target out is passed over, another is halved.
type crossing struct {
	path   *path
	sign   float64 // +1 if the target is above the start
	wanted float64 // target less start, K
	fine   float64 // by how much a path may pass the target unseen, K
	coarse float64 // enclosure within which a crossing counts as one
	left   int     // intervals that may still be looked at
	bound  float64 // how far the path may come from where on the target is out of reach, K
}

const (
	unseen        = 1e-8 // of the largest difference between the start and the ambient
	single        = 1e-6
	mostIntervals = 100_000
)

// reached reports whether the target is met or passed. A body only tends to what a log ends with.
func (c *crossing) reached(s *state) bool {
	if f := c.path.solution.following; math.IsInf(s.fo, 1) && f.rate == 0 {
		return f.wave == nil && c.sign*(f.last-c.path.solution.problem.Initial.SI()-c.wanted) > 0
	}
	return c.sign*(s.rise()-c.wanted) >= 0
}

// enclose returns between what an interval holds the path.
func (c *crossing) enclose(a, b *state) (low, high float64) {
	w := c.path.solution.following.wave
	if w == nil {
		return a.up - b.down, b.up - a.down
	}
	// a swing S goes on as it is but for what is still to come in: |S(t) − e^{iω(t − a)} S(a)| ≤ θ(a) − θ(t)
	low, high = sineRange(cmplx.Phase(a.swing), w.omega*(b.fo-a.fo))
	size, slack := cmplx.Abs(a.swing), a.theta-b.theta
	low, high = w.amplitude*(low*size-slack), w.amplitude*(high*size+slack)
	if w.amplitude < 0 {
		low, high = high, low
	}
	base1, base2 := a.up-a.down, b.up-b.down
	return math.Min(base1, base2) + low, math.Max(base1, base2) + high
}

// sineRange returns the range of sin from a phase on over a turn.
func sineRange(phase, turn float64) (low, high float64) {
	a, b := math.Sin(phase), math.Sin(phase+turn)
	low, high = math.Min(a, b), math.Max(a, b)
	passes := func(at float64) bool { // phase … phase + turn passes at + 2πk
		ahead := math.Mod(at-phase, 2*math.Pi)
		if ahead < 0 {
			ahead += 2 * math.Pi
		}
		return ahead <= turn
	}
	if !(turn < 2*math.Pi) || passes(math.Pi/2) {
		high = 1
	}
	if !(turn < 2*math.Pi) || passes(-math.Pi/2) {
		low = -1
	}
	return low, high
}

// within returns the first Fourier number in an interval at the begin of which the target is not reached.
func (c *crossing) within(a, b state) (fo float64, found bool) {
	if c.left--; c.left < 0 {
		return math.NaN(), false
	}
	c.path.pass(a.fo)
	low, high := c.enclose(&a, &b)
	most := high
	if c.sign < 0 {
		most = -low
	}
	crossed := c.reached(&b)
	switch {
	case !crossed && most <= c.sign*c.wanted+c.fine:
		if math.IsInf(b.fo, 1) {
			c.bound = c.sign * most
		}
		return 0, false
	case b.fo <= a.fo*(1+4*epsilon) || b.fo < 1e-290:
		return b.fo, crossed
	case crossed && high-low <= c.coarse:
		return root.Find(func(fo float64) float64 {
			now := c.path.state(fo)
			return now.rise() - c.wanted
		}, a.fo, b.fo, 0)
	}
	middle := c.path.state(between(a.fo, b.fo))
	if fo, found = c.within(a, middle); found || math.IsNaN(fo) {
		return fo, found
	}
	if c.reached(&middle) { // by a rounding
		return middle.fo, true
	}
	return c.within(middle, b)
}

// between returns where an interval is divided: by its logarithm where it is long.
func between(a, b float64) float64 {
	switch {
	case math.IsInf(b, 1):
		return math.Max(0.1, 4*a)
	case a == 0:
		return b / 16
	case b > 4*a:
		return math.Sqrt(a) * math.Sqrt(b)
	}
	return a + (b-a)/2
}

// followingTimeTo returns when a position, or the mean for nil, is first at the target.
func (s *Solution) followingTimeTo(p *position, place string, target units.Temperature) (units.Duration, error) {
	start, f := s.problem.Initial.SI(), s.following
	wanted := target.SI() - start
	switch {
	case wanted == 0:
		return units.Duration{}, nil
	case s.Biot() == 0:
		return units.Duration{}, &units.NeverError{Place: place, Target: target, Limit: s.problem.Initial}
	}
	c := crossing{path: s.newPath(p), sign: math.Copysign(1, wanted), wanted: wanted, left: mostIntervals + 50*len(f.pieces)}
	span := math.Max(math.Abs(wanted), s.largestExcess())
	c.fine, c.coarse = unseen*span, single*span
	begin := c.path.state(0)
	if c.reached(&begin) {
		return units.Duration{}, nil
	}
	end := f.horizon / s.scale
	if f.rate < 0 {
		end *= 1 - 1e-9 // where the ambient is above 0 K
	}
	fo, found := 0.0, false
	if end > 0 {
		fo, found = c.within(begin, c.path.state(end))
	}
	switch t := units.Second.Of(fo * s.scale); {
	case found && t.IsFinite():
		return t, nil
	case found:
		return t, &units.ConvergenceError{
			Method: "time to a temperature", Place: place,
			Reason: "the target " + target.String() + " is reached at a time beyond the range of float64",
		}
	case math.IsNaN(fo):
		return units.Duration{}, &units.ConvergenceError{
			Method: "time to a temperature", Place: place,
			Reason: "the temperature stays so close to the target " + target.String() + " that no first time is told",
		}
	}
	return units.Duration{}, s.notFollowed(&c, place, target, end)
}

// largestExcess returns the largest difference between the start and the ambient.
func (s *Solution) largestExcess() float64 {
	f, start := s.following, s.problem.Initial.SI()
	if w := f.wave; w != nil {
		return math.Abs(start-w.mean) + math.Abs(w.amplitude)
	}
	now := -s.excess
	largest := math.Abs(now)
	for _, p := range f.pieces {
		now += p.rise
		largest = math.Max(largest, math.Abs(now))
	}
	return largest
}

// notFollowed returns the answer for a target that is not come to: nil if it is met at the start, since the body goes away
// from it at first and in the end.
func (s *Solution) notFollowed(c *crossing, place string, target units.Temperature, end float64) error {
	f, start := s.following, s.problem.Initial.SI()
	first, last := -s.excess, f.last-start
	never := units.NeverError{Place: place, Target: target, Limit: units.Kelvin.Of(f.last)}
	switch w := f.wave; {
	case w != nil:
		if last = w.mean - start; first == 0 {
			first = w.amplitude * real(w.begin)
		}
		never.Limit = units.Kelvin.Of(w.mean)
		never.Condition = "± " + units.KelvinDifference.Of(math.Abs(w.amplitude)*cmplx.Abs(c.path.settled)).String() + " as the ambient oscillates"
	case len(f.pieces) > 0 && first == 0:
		first = f.pieces[0].rise
	case f.rate != 0:
		if last = f.rate; first == 0 {
			first = f.rate
		}
		never.Limit = units.Kelvin.Of(start + c.bound)
		never.Condition = "at most, and goes away with its surroundings"
	}
	switch {
	case c.sign*last < 0 && c.sign*first <= 0:
		return nil
	case !math.IsInf(end, 1):
		at := units.Second.Of(end * s.scale)
		now := c.path.state(end)
		limit, err := f.course.At(at)
		if err != nil {
			limit = s.ambient
		}
		return &units.HorizonError{Place: place, Target: target, Horizon: at, Reached: units.Kelvin.Of(start + now.rise()), Limit: limit}
	}
	return &never
}
