package series

import (
	"math"
	"math/cmplx"
	"sort"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/derivation"
	"example.com/coolward/units/shape"
)

// A following is the course of an ambient, or of a prescribed surface temperature, that goes with time. The body answers
// each change of it as a step, by Duhamel's superposition (H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids,
// 2nd ed., section 1.14, from memory). The ambient of the solution is that at time 0.
type following struct {
	course  boundary.Course
	horizon float64 // s, +Inf without one
	rate    float64 // of a ramp, K per Fourier number
	wave    *wave
	pieces  []piece // of a log
	last    float64 // ambient that a log ends with, K
}

// A wave is the ambient mean + amplitude Im(begin e^{iω Fo}).
type wave struct {
	mean, amplitude float64 // K
	omega           float64 // per Fourier number
	begin           complex128
}

// A piece of a log is straight between two Fourier numbers, or a step at one.
type piece struct{ from, to, rise float64 }

// mostTurns is the angle by which an oscillation may turn before the series of all factors converge, which bounds the work.
const mostTurns = 2000

// settledSurface returns the condition of a constant ambient for that of a course which stays, and any other as it is.
func settledSurface(c boundary.Condition) boundary.Condition {
	if h, course, ok := c.Following(); ok {
		if T, ok := course.Steady(); ok {
			return boundary.Constant(h, T)
		}
	} else if course, ok := c.SurfaceCourse(); ok {
		if T, ok := course.Steady(); ok {
			return boundary.Temperature(T)
		}
	}
	return c
}

// courseOf returns the course that a condition follows.
func courseOf(c boundary.Condition) (course boundary.Course, ok bool) {
	if _, course, ok = c.Following(); ok {
		return course, true
	}
	if _, constant := c.SurfaceTemperature(); constant {
		return course, false
	}
	return c.SurfaceCourse()
}

// follow prepares a course.
func (s *Solution) follow(course boundary.Course) error {
	f := &following{course: course, horizon: math.Inf(1), last: s.ambient.SI()}
	if start, rate, ok := course.Ramp(); ok {
		f.rate = rate.SI() * s.scale
		if math.IsInf(f.rate, 0) || (f.rate == 0) != (rate.SI() == 0) {
			return outOfRange("rate of the ambient times R²/alpha in K", f.rate)
		}
		if rate.SI() < 0 {
			f.horizon = -start.SI() / rate.SI()
		}
	}
	if mean, amplitude, period, lag, ok := course.Oscillation(); ok {
		if !(math.Abs(amplitude.SI()) < mean.SI()) {
			return &units.ArgumentError{Field: "course: amplitude", Value: amplitude, Accepted: "less than the mean, so that the ambient stays above 0 K"}
		}
		omega, join := 2*math.Pi/(period.SI()/s.scale), s.echo(nil).join
		if !(omega > 1e-290 && omega*join <= mostTurns) {
			return &units.ArgumentError{Field: "course: period", Value: period, Accepted: units.Second.Of(2*math.Pi*join*s.scale/mostTurns).String() + " or more in this body"}
		}
		f.wave = &wave{mean: mean.SI(), amplitude: amplitude.SI(), omega: omega, begin: cmplx.Rect(1, -2*math.Pi*math.Mod(lag.Ratio(period), 1))}
	}
	if times, temperatures, ok := course.Readings(); ok {
		end := times[len(times)-1].SI()
		f.last = temperatures[len(temperatures)-1].SI()
		if _, err := course.At(units.Second.Of(math.Max(0, math.Nextafter(end, math.Inf(1))))); err != nil {
			f.horizon = math.Max(0, end)
		}
		before, now := 0.0, s.ambient.SI()
		for i, t := range times {
			if t.SI() <= 0 {
				continue
			}
			fo := t.SI() / s.scale
			if math.IsInf(fo, 0) {
				return outOfRange("Fourier number of a reading of the log", fo)
			}
			T := temperatures[i].SI()
			if T != now {
				f.pieces = append(f.pieces, piece{from: before, to: fo, rise: T - now})
			}
			before, now = fo, T
		}
	}
	s.following = f
	return nil
}

// refuseFollowing refuses an ambient that goes with time.
func (s *Solution) refuseFollowing() error {
	if s.following == nil {
		return nil
	}
	return &units.ArgumentError{Field: "surface condition", Value: s.problem.Surface.String(), Accepted: "for this question an ambient that stays: boundary.Constant(h, ambient) or boundary.Temperature(T)"}
}

// checkWithin refuses a time past the end of the course.
func (f *following) checkWithin(t units.Duration) error {
	if t.SI() > f.horizon {
		return &units.ArgumentError{Field: "time", Value: t, Accepted: "0 s to " + units.Second.Of(f.horizon).String() + ", where the ambient ends"}
	}
	_, err := f.course.At(t)
	return err
}

// followingAt returns the temperature of a position, or of the mean for nil.
func (s *Solution) followingAt(p *position, t units.Duration) (units.Temperature, error) {
	if err := s.following.checkWithin(t); err != nil {
		return units.Temperature{}, err
	}
	T := units.Kelvin.Of(s.problem.Initial.SI() + s.newPath(p).state(s.Fourier(t)).rise())
	return T, units.CheckTemperature("temperature that the ambient leads to", T)
}

// followingReleased returns the heat that has left, which is what the mean has fallen by.
func (s *Solution) followingReleased(t units.Duration) (units.Energy, error) {
	if err := s.following.checkWithin(t); err != nil {
		return units.Energy{}, err
	}
	fall := -s.newPath(nil).state(s.Fourier(t)).rise()
	heat := units.Joule.Of(s.problem.Body.Volume().SI() * s.problem.Density.SI() * s.problem.SpecificHeat.SI() * fall)
	return heat, units.CheckFinite("heat that has left", heat)
}

// followed bounds what is left out of a temperature under an ambient that goes with time over the changes of that. For
// steps and straight pieces it is 1e-15, for oscillations 4e-15 of the changes before the series converge, by comparison
// with closed forms.
const followed = 1e-14

// changes returns by how much the surroundings have changed in all, up and down, by a Fourier number; of an oscillation
// those count that are before the series converge.
func (s *Solution) changes(fo float64) float64 {
	f := s.following
	if w := f.wave; w != nil {
		return math.Abs(s.problem.Initial.SI()-w.mean) + math.Abs(w.amplitude)*(1+w.omega*math.Min(fo, s.echo(nil).join))
	}
	total := math.Abs(s.excess) + math.Abs(f.rate)*fo
	for _, p := range f.pieces {
		if p.from <= fo {
			total += math.Abs(p.rise)
		}
	}
	return total
}

// A path is the temperature of a place under a course, less the start.
type path struct {
	solution *Solution
	echo     *echo
	settled  complex128 // amplitude under an oscillation of 1

	// The pieces of a log before next have ended so long ago that they are terms of the series.
	next  int
	at    float64    // the Fourier number that left is for
	done  [2]float64 // changes, up and down, of them
	left  [2][]float64
	began bool
}

// A state is where a path is: up and down are what rises and falls have done until then, each of which never decreases.
// Under an oscillation they are those of the mean, and swing is what comes on top.
type state struct {
	fo, up, down float64
	theta        float64
	swing        complex128
	wave         float64
}

func (s state) rise() float64 { return s.up - s.down + s.wave }

// newPath returns the path of a position, or of the mean for nil.
func (s *Solution) newPath(p *position) *path {
	path := &path{solution: s, echo: s.echo(p)}
	if w := s.following.wave; w != nil {
		path.settled = path.echo.amplitude(w.omega)
	}
	return path
}

// add counts a change.
func (s *state) add(change float64) {
	if change > 0 {
		s.up += change
	} else {
		s.down -= change
	}
}

// state returns where the path is at a Fourier number, which may be +Inf. An oscillation has no state there: its wave is
// NaN.
func (p *path) state(fo float64) state {
	f, e := p.solution.following, p.echo
	now := state{fo: fo}
	loss := 1.0
	if !math.IsInf(fo, 1) {
		loss = e.loss(fo)
	}
	switch w := f.wave; {
	case w != nil:
		now.add((w.mean - p.solution.problem.Initial.SI()) * loss)
		if math.IsInf(fo, 1) {
			now.wave = math.NaN()
			return now
		}
		now.theta = 1 - loss
		turn := cmplx.Rect(1, 2*math.Pi*math.Mod(fo*w.omega/(2*math.Pi), 1))
		now.swing = w.begin * (p.settled*turn - e.left(fo, w.omega))
		now.wave = w.amplitude * imag(now.swing)
		return now
	case f.rate != 0:
		now.add(f.rate * (fo - e.between(0, fo)))
	}
	now.add(-p.solution.excess * loss)
	now.up, now.down = now.up+p.done[0], now.down+p.done[1]
	if p.began {
		decay := fo - p.at
		for n, rate := range e.rate {
			if x := rate * decay; x < forgotten {
				x = math.Exp(-x)
				now.up -= p.left[0][n] * x
				now.down -= p.left[1][n] * x
			}
		}
	}
	for i := p.next; i < len(f.pieces) && f.pieces[i].from <= fo; i++ {
		now.add(e.answer(f.pieces[i], fo))
	}
	return now
}

// simple is the length of a piece over its age up to which Simpson's rule is good to 1e-15.
const simple = 1e-3

// answer returns what a piece of a log has done by a Fourier number at or after its begin.
func (e *echo) answer(p piece, fo float64) float64 {
	if math.IsInf(fo, 1) {
		return p.rise
	}
	if p.from == p.to {
		return p.rise * e.loss(fo-p.to)
	}
	to, length := math.Min(p.to, fo), p.to-p.from
	if age := fo - p.to; length < simple*age { // by Simpson's rule, where ages would cancel
		return p.rise * (e.loss(age) + 4*e.loss(age+length/2) + e.loss(age+length)) / 6
	}
	return p.rise / length * ((to - p.from) - e.between(fo-to, fo-p.from))
}

// pass makes terms of all pieces that ended before the join, seen from fo; no earlier state is asked for then.
func (p *path) pass(fo float64) {
	f, e := p.solution.following, p.echo
	old := p.next + sort.Search(len(f.pieces)-p.next, func(i int) bool { return fo-f.pieces[p.next+i].to < e.join })
	if old == p.next {
		return
	}
	if !p.began {
		p.left, p.began = [2][]float64{make([]float64, len(e.c)), make([]float64, len(e.c))}, true
	}
	for n, rate := range e.rate {
		decay := math.Exp(-rate * (fo - p.at))
		p.left[0][n] *= decay
		p.left[1][n] *= decay
		for _, piece := range f.pieces[p.next:old] {
			if rate*(fo-piece.to) > forgotten {
				continue
			}
			side, rise, length := 0, piece.rise, piece.to-piece.from
			if rise < 0 {
				side, rise = 1, -rise
			}
			if length > 0 {
				rise *= eigen.Decayed(rate, length) / length
			}
			p.left[side][n] += rise * e.c[n] * math.Exp(-rate*(fo-piece.to))
		}
	}
	for _, piece := range f.pieces[p.next:old] {
		if piece.rise > 0 {
			p.done[0] += piece.rise
		} else {
			p.done[1] -= piece.rise
		}
	}
	p.next, p.at = old, fo
}

// addFollowing adds what belongs to an ambient that goes with time.
func (s *Solution) addFollowing(r *derivation.Record) {
	f := s.following
	what := "ambient"
	if s.prescribed {
		what = "surface temperature"
		r.Note("The surface follows its course from time 0 on: Bi is infinite, and the limits of the formulas are taken.")
	} else {
		r.Add("h", "heat transfer coefficient", s.coefficient, "given")
	}
	r.Note("The " + what + " Tinf goes with time: " + f.course.String() + ".")
	r.Add("Tinf_0", what+" at time 0", s.ambient, "by its course")
	switch w := f.wave; {
	case w != nil:
		r.AddNumber("omega", "angular frequency over the Fourier number", w.omega, "2 π tF / period")
		r.Note("T = Tm + (T0 − Tm) theta + A Im[e^(−i omega lag / tF) (H e^(i omega Fo) − L)] for the mean Tm and the amplitude A; H = 1 − i omega ∫ theta e^(−i omega u) du over all u, L = Σ C_n f_n zeta_n² / (zeta_n² + i omega) e^(−zeta_n² Fo), which is what the start has left.")
	case f.rate != 0:
		r.Note("T = Tinf(t) + (T0 − Tinf_0) theta − rate tF ∫ theta dFo from 0 to Fo.")
	default:
		r.Note("T = Tinf(t) + (T0 − Tinf_0) theta(Fo) − Σ rise theta(Fo − Fo_step) over the steps − Σ slope tF ∫ theta over the ages Fo − u of each straight piece.")
	}
	r.Source("H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., Oxford University Press 1959, section 1.14, for the superposition (from memory)")
	r.Note("with Fo = t / tF and x = distance from the centre / R.")
}

// monotone reports whether the surroundings only ever draw the body one way: then the centre is last and the corner
// first throughout.
func (s *Solution) monotone() bool {
	f := s.following
	up, down := s.excess < 0 || f.rate > 0, s.excess > 0 || f.rate < 0
	for _, p := range f.pieces {
		up, down = up || p.rise > 0, down || p.rise < 0
	}
	return !(up && down) && (f.wave == nil || f.wave.amplitude == 0)
}

// whereFollowing is whereTo for an ambient that goes with time.
func (s *Solution) whereFollowing(place shape.Place) error {
	if s.following == nil || !place.IsSlowest() && !place.IsFastest() || s.monotone() {
		return nil
	}
	return &units.ArgumentError{Field: "place", Value: place.String(), Accepted: "a certain place: under an ambient that draws the body both ways no place is the slowest or the fastest throughout"}
}
