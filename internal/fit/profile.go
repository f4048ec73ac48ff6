package fit

import (
	"math"

	"example.com/coolward/internal/root"
)

// A Profile finds intervals around a fitted curve: all for which the sum of squares is not above Level.
type Profile struct {
	Problem *Exponential
	Best    Curve
	Level   float64
	Spread  float64 // standard error of ln τ, the scale of the search
}

// widest is how far from its best the search follows ln τ.
const widest = 25.0

// An Interval is from Low to High; an open side has no bound.
type Interval struct {
	Low, High         float64
	OpenLow, OpenHigh bool
}

// side follows x from its best until rise is above 0, and returns where it is 0; ok is false if it is
// nowhere within the limit. The first step is the standard error of x.
func side(rise func(x float64) float64, best, step, limit float64) (x float64, ok bool) {
	at, last := best, best
	for range 60 {
		at = best + step
		beyond := (at-limit)*step >= 0
		if beyond {
			at = limit
		}
		switch r := rise(at); {
		case math.IsNaN(r):
			return 0, false
		case r >= 0:
			x, ok := root.Find(rise, last, at, 1e-7*math.Abs(at-best))
			return x, ok
		case beyond:
			return 0, false
		}
		last = at
		step *= 1.7
	}
	return 0, false
}

// Tau returns the interval of ln τ.
func (p *Profile) Tau() Interval {
	u := math.Log(p.Best.Tau)
	rise := func(u float64) float64 { return p.Problem.Conditional(u).Squares - p.Level }
	return p.both(rise, u, p.Spread, u-widest, u+widest)
}

func (p *Profile) both(rise func(x float64) float64, best, step, low, high float64) Interval {
	var i Interval
	var ok bool
	if i.Low, ok = side(rise, best, -step, low); !ok {
		i.OpenLow = true
	}
	if i.High, ok = side(rise, best, step, high); !ok {
		i.OpenHigh = true
	}
	return i
}

// through returns by how much the best curve through y at time t is above the level. It follows the
// best ln τ from call to call.
func (p *Profile) through() func(t, y float64) float64 {
	best := math.Log(p.Best.Tau)
	u, low, high := best, best-widest, best+widest
	return func(t, y float64) float64 {
		f := func(u float64) float64 { return p.Problem.Through(u, t, y).Squares }
		u = descend(f, u, 0.3*min(p.Spread, 1), low, high)
		return f(u) - p.Level
	}
}

// Value returns the interval of the curve at time t, which may be infinite. The standard error gives the
// scale of the search.
func (p *Profile) Value(t, standardError float64) Interval {
	y := p.Best.At(t)
	if math.IsNaN(p.Problem.Start) || math.IsNaN(p.Problem.Ambient) {
		far := 1e6 * (math.Abs(p.Best.Start-p.Best.Ambient) + standardError)
		var i Interval
		var ok bool
		up, down := p.through(), p.through()
		if i.Low, ok = side(func(y float64) float64 { return down(t, y) }, y, -standardError, y-far); !ok {
			i.OpenLow = true
		}
		if i.High, ok = side(func(y float64) float64 { return up(t, y) }, y, standardError, y+far); !ok {
			i.OpenHigh = true
		}
		return i
	}
	// Only τ is free: the curve goes one way with it.
	tau := p.Tau()
	at := func(u float64, open, long bool) float64 {
		c := p.Best
		if c.Tau = math.Exp(u); open && long {
			return c.Start
		} else if open {
			return c.Ambient
		}
		return c.At(t)
	}
	a, b := at(tau.Low, tau.OpenLow, false), at(tau.High, tau.OpenHigh, true)
	return Interval{Low: min(a, b), High: max(a, b)}
}

// Time returns the interval of the time after the first reading at which the curve is at y, from 0 on.
func (p *Profile) Time(t, y, standardError float64) Interval {
	if !math.IsNaN(p.Problem.Start) && !math.IsNaN(p.Problem.Ambient) {
		tau := p.Tau()
		i := Interval{OpenLow: tau.OpenLow, OpenHigh: tau.OpenHigh}
		i.Low, i.High = t*math.Exp(tau.Low)/p.Best.Tau, t*math.Exp(tau.High)/p.Best.Tau
		return i
	}
	var i Interval
	var ok bool
	before := p.through()
	if i.Low, ok = side(func(t float64) float64 { return before(t, y) }, t, -min(standardError, t/2), 0); !ok {
		i.Low = 0
	}
	after := p.through()
	i.High, ok = side(func(t float64) float64 { return after(t, y) }, t, standardError, t+1e4*(t+p.Best.Tau))
	i.OpenHigh = !ok
	return i
}
