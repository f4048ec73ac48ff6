package series

import (
	"math"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// A Track follows the temperature of one place while the ambient, or the prescribed surface temperature,
// follows a log that is given sample by sample, linear in between. Each sample costs one step of every term of
// the series, however long the log is (Duhamel's superposition: H. S. Carslaw and J. C. Jaeger, Conduction of
// Heat in Solids, 2nd ed., section 1.14, from memory). What the terms leave out shortly after a bend is taken
// from a table that is good to a millionth of a change of the ambient.
//
// A Track changes with each sample; it is for one goroutine.
type Track struct {
	response    *eigen.Response
	scale       float64 // R²/α, s
	fo          float64 // of the last sample
	ambient     float64 // then, K
	slope       float64 // of the ambient before it, K per Fourier number
	rest        float64 // what a slope of 1 leaves behind in the terms left out, once settled
	state       [eigen.CylinderTerms]float64
	step        float64 // Fourier number that decay and gain are for
	decay       [eigen.CylinderTerms]float64
	gain        [eigen.CylinderTerms]float64
	recent      [recentChanges]change // those from oldest to end are in use
	oldest, end int
}

// A change of the ambient that the terms left out still feel. A bend b is one of the slope; a jump is a step,
// and so is a shift, which stands for a bend that has been moved.
type change struct{ at, bend, jump, shift float64 }

// recentChanges is how many changes within the time of the short-time form are kept.
const recentChanges = 256

// shortest is the Fourier number below which a straight piece of the log counts as a step.
const shortest = 1e-9

// Track returns a follower of a place, or of [shape.Mean], that begins at time 0 with the start temperature and the
// ambient of the problem at that time. For a log that is known as a whole, put it into the problem by boundary.Following. It returns an [*units.ArgumentError] for a place that is not in the body and for a body of
// several coordinates, in which temperatures that follow a log are no products.
func (s *Solution) Track(place shape.Place) (*Track, error) {
	r, err := s.response(place)
	if err != nil {
		return nil, err
	}
	rest, _ := r.MissingIntegral(r.Join())
	k := &Track{response: r, scale: s.scale, ambient: s.ambient.SI(), rest: rest}
	k.jump(-s.excess)
	return k, nil
}

// response returns how a place answers, for bodies of one coordinate.
func (s *Solution) response(place shape.Place) (*eigen.Response, error) {
	if err := s.oneCoordinate(); err != nil {
		return nil, err
	}
	if place.IsMean() {
		return eigen.NewResponseOfMean(s.factors[0].modes), nil
	}
	p, err := s.position(place)
	if err != nil {
		return nil, err
	}
	return eigen.NewResponse(s.factors[0].modes, p[0]), nil
}

// oneCoordinate refuses the zero Solution and a product.
func (s *Solution) oneCoordinate() error {
	if err := s.check(units.Duration{}); err != nil {
		return err
	}
	if s.given != nil {
		return s.noFlux()
	}
	if s.count > 1 {
		return &units.ArgumentError{Field: "body under a varying ambient", Value: s.problem.Body.String(), Accepted: "a plate, a long cylinder or a sphere"}
	}
	return nil
}

// Add takes the next sample of the log, the ambient at time t, and returns the temperature of the place then.
// Between the last sample and this one the ambient is linear; a second sample at the same time is a step. It
// returns an [*units.ArgumentError] for a time before the last one or without a finite Fourier number, and for
// an ambient that is no temperature; the sample is not taken then.
func (k *Track) Add(t units.Duration, ambient units.Temperature) (units.Temperature, error) {
	if k == nil || k.response == nil {
		return units.Temperature{}, &units.ArgumentError{Field: "track", Accepted: "a track made by Solution.Track"}
	}
	fo := t.SI() / k.scale
	if !(fo >= k.fo) || math.IsInf(fo, 1) {
		return units.Temperature{}, &units.ArgumentError{Field: "time of the sample", Value: t, Accepted: "finite, from that of the last one on, " + units.Second.Of(k.fo*k.scale).String()}
	}
	if err := units.CheckTemperature("ambient of the sample", ambient); err != nil {
		return units.Temperature{}, err
	}
	rise := ambient.SI() - k.ambient
	if step := fo - k.fo; step >= shortest {
		k.advance(fo, rise/step)
	} else {
		if step > 0 {
			k.advance(fo, 0)
		}
		if rise != 0 {
			k.jump(rise)
		}
	}
	k.ambient = ambient.SI()
	return units.Kelvin.Of(k.ambient + k.excess()), nil
}

// advance moves every term along a straight piece of the log.
func (k *Track) advance(fo, slope float64) {
	if slope != k.slope {
		k.keep(change{at: k.fo, bend: slope - k.slope})
	}
	c, rate := k.response.Terms()
	if step := fo - k.fo; step != k.step {
		k.step = step
		for n := range c {
			k.decay[n] = math.Exp(-rate[n] * step)
			k.gain[n] = c[n] * eigen.Decayed(rate[n], step)
		}
	}
	for n := range c {
		k.state[n] = k.state[n]*k.decay[n] - slope*k.gain[n]
	}
	k.fo, k.slope = fo, slope
}

// jump lets the ambient rise at once.
func (k *Track) jump(rise float64) {
	c, _ := k.response.Terms()
	for n := range c {
		k.state[n] -= rise * c[n]
	}
	k.keep(change{at: k.fo, jump: rise})
}

// keep remembers a change.
func (k *Track) keep(c change) {
	if k.end == recentChanges {
		k.makeRoom()
	}
	k.recent[k.end] = c
	k.end++
}

// makeRoom moves the changes to the front of the array and, if there are still many, merges each two of the
// older half: a bend moved from one time to a later one leaves a shift by bend times the time between, and an
// error of second order in that time.
func (k *Track) makeRoom() {
	k.end = copy(k.recent[:], k.recent[k.oldest:k.end])
	k.oldest = 0
	if k.end < recentChanges/2 {
		return
	}
	out := 0
	for i := 0; i < k.end; i++ {
		c := k.recent[i]
		if i+1 < recentChanges/2 && c.jump == 0 && k.recent[i+1].jump == 0 {
			next := k.recent[i+1]
			c = change{at: next.at, bend: c.bend + next.bend, shift: c.shift + next.shift + c.bend*(next.at-c.at)}
			i++
		}
		k.recent[out] = c
		out++
	}
	if out == recentChanges { // jumps all of them: the oldest counts as settled
		out = copy(k.recent[:], k.recent[1:])
	}
	k.end = out
}

// excess returns how far the place is above the ambient.
func (k *Track) excess() float64 {
	total := -k.slope * k.rest
	c, _ := k.response.Terms()
	for n := range c {
		total += k.state[n]
	}
	for k.oldest < k.end && k.fo-k.recent[k.oldest].at >= k.response.Join() {
		k.oldest++
	}
	for i := k.oldest; i < k.end; i++ {
		c := &k.recent[i]
		age := k.fo - c.at
		if c.bend != 0 || c.shift != 0 {
			integral, theta := k.response.MissingIntegral(age)
			total += c.bend*(k.rest-integral) - c.shift*theta
		}
		if c.jump != 0 {
			total -= c.jump * k.response.Missing(age)
		}
	}
	return total
}
