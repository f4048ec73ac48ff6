package fdm

import (
	"math"
	"slices"
	"sort"

	"example.com/coolward/internal/fv"
	"example.com/coolward/internal/rosenbrock"
	"example.com/coolward/units/boundary"
)

// bends returns the times at which an ambient or the temperature of a surface has a step or a bend before the end,
// and the end.
func (p Problem) bends(end float64) []float64 {
	times := []float64{end}
	for _, c := range p.conditions() {
		for _, course := range c.Courses() {
			times = append(times, bendsOf(course, end)...)
		}
	}
	slices.Sort(times)
	return slices.Compact(times)
}

func bendsOf(c boundary.Course, end float64) []float64 {
	var times []float64
	for _, t := range c.Bends() {
		if t.SI() > 0 && t.SI() < end {
			times = append(times, t.SI())
		}
	}
	return times
}

// A stretch is a system whose time counts from where the last stretch ended. It sees the conditions as they are
// before its own end.
type stretch struct {
	*fv.System
	from, last float64
}

func (s *stretch) time(t float64) float64 { return min(s.from+t, s.last) }

// Rate implements rosenbrock.System.
func (s *stretch) Rate(t float64, y, f []float64) error { return s.System.Rate(s.time(t), y, f) }

// Linearise implements rosenbrock.System.
func (s *stretch) Linearise(t, h float64, y, f, ft []float64) error {
	return s.System.Linearise(s.time(t), h, y, f, ft)
}

// integrate steps from one of the given times to the next.
func integrate(system *fv.System, times []float64, o rosenbrock.Options) (history, rosenbrock.Statistics, error) {
	// The linearly implicit method is as short as the way to the next jump of a heat capacity.
	steps := func(sys rosenbrock.System, y0 []float64, o rosenbrock.Options) (history, rosenbrock.Statistics, error) {
		h, st, err := rosenbrock.Integrate(sys, y0, o)
		return h, st, err
	}
	if system.Melts() {
		steps = func(sys rosenbrock.System, y0 []float64, o rosenbrock.Options) (history, rosenbrock.Statistics, error) {
			h, st, err := rosenbrock.IntegrateImplicit(sys, y0, o)
			return monotone{h}, st, err
		}
	}
	if len(times) == 1 {
		o.End = times[0]
		return steps(system, system.Start(), o)
	}
	all := &segments{times: []float64{0}}
	var total rosenbrock.Statistics
	state, from := system.Start(), 0.0
	accepted, stopped := o.Accepted, false
	left := o.MaxSteps
	given := o.Times
	for i, end := range times {
		s := &stretch{system, from, end}
		if given != nil {
			o.Times, given = until(given, from, end)
		}
		if i < len(times)-1 {
			s.last = math.Nextafter(end, 0)
		}
		o.End, o.MaxSteps = end-from, left
		o.Accepted = func(t float64, y []float64, size float64) (bool, error) {
			var err error
			stopped, err = accepted(from+t, y, size)
			return stopped, err
		}
		h, st, err := steps(s, state, o)
		all.add(h, from, end)
		total.Steps += st.Steps
		total.Rejected += st.Rejected
		total.Evaluations += st.Evaluations
		left -= st.Steps + st.Rejected
		if err != nil || stopped {
			return all, total, err
		}
		state = slices.Clone(h.State(h.Steps()))
		from = end
		if i < len(times)-1 {
			if err := system.Hold(end, state); err != nil {
				return all, total, err
			}
		}
	}
	return all, total, nil
}

// until splits the ends of steps at a time, and counts those before from the start of a stretch.
func until(times []float64, from, end float64) (before, after []float64) {
	n := sort.SearchFloat64s(times, end)
	if n < len(times) && times[n] == end {
		n++
	}
	before = make([]float64, n)
	for i, t := range times[:n] {
		before[i] = t - from
	}
	return before, times[n:]
}

// segments are histories one after the other.
type segments struct {
	parts []history
	first []int     // step of each part
	times []float64 // ends of all steps
}

// add appends a history that begins at a time and, if it is whole, ends at another.
func (s *segments) add(h history, from, end float64) {
	if h.Steps() == 0 && len(s.parts) > 0 {
		return
	}
	s.parts = append(s.parts, h)
	s.first = append(s.first, len(s.times)-1)
	for k := 1; k <= h.Steps(); k++ {
		s.times = append(s.times, min(from+h.Time(k), end))
	}
}

// part returns the history of a step, and its number there.
func (s *segments) part(k int) (history, int) {
	i := sort.SearchInts(s.first, k+1) - 1
	return s.parts[i], k - s.first[i]
}

func (s *segments) Steps() int { return len(s.times) - 1 }

func (s *segments) Time(k int) float64 { return s.times[k] }

func (s *segments) State(k int) []float64 {
	if k == s.Steps() && k > 0 {
		h, j := s.part(k - 1)
		return h.State(j + 1)
	}
	h, j := s.part(k)
	return h.State(j)
}

func (s *segments) Find(t float64) (k int, fraction float64) {
	if s.Steps() == 0 || !(t > 0) {
		return 0, 0
	}
	k = min(sort.SearchFloat64s(s.times, t), s.Steps()) - 1
	return k, min((t-s.times[k])/(s.times[k+1]-s.times[k]), 1)
}

func (s *segments) Value(k int, fraction float64, i int) float64 {
	h, j := s.part(k)
	return h.Value(j, fraction, i)
}

func (s *segments) Cubic(k, i int) [4]float64 {
	h, j := s.part(k)
	return h.Cubic(j, i)
}

// A monotone history is one of a body that melts. Between the ends of a step no enthalpy goes beyond them: a parabola
// through a node that enters a transition, where its temperature nearly stands still, would go beyond by many kelvin.
type monotone struct{ *rosenbrock.History }

// Value returns component i in step k after the fraction s of it.
func (m monotone) Value(k int, s float64, i int) float64 {
	if s <= 0 || s >= 1 {
		return m.History.Value(k, s, i)
	}
	c := m.Cubic(k, i)
	return c[0] + s*(c[1]+s*(c[2]+s*c[3]))
}

// Cubic returns the coefficients of component i in step k: of c0 + s Δ + s (1−s) d with d between −Δ and Δ.
func (m monotone) Cubic(k, i int) [4]float64 {
	c := m.History.Cubic(k, i)
	rise := c[1] + c[2] + c[3]
	d := min(max(-c[2], -abs(rise)), abs(rise))
	return [4]float64{c[0], rise + d, -d}
}
