package linear

import "math"

// A Drive is the power into one node over time: Constant + Slope t + Σ Cos cos ωt + Sin sin ωt.
type Drive struct {
	Constant, Slope float64 // W, W/s
	Waves           []Wave
}

// A Wave is Cos cos ωt + Sin sin ωt.
type Wave struct{ Omega, Cos, Sin float64 }

// Run returns the temperature of each node over time, from sizes x of the modes at t = 0, with a drive
// for each node. A part without a leak may have a constant drive only.
func (m *Modes) Run(x []float64, drives []Drive) []Curve {
	curves := make([]Curve, len(drives))
	for k, rate := range m.Rate {
		one := m.mode(k, x[k], drives)
		for i, u := range m.Shape[k] {
			if u != 0 {
				curves[i].add(u, &one, rate)
			}
		}
	}
	return curves
}

// mode returns the size of mode k over time.
func (m *Modes) mode(k int, x float64, drives []Drive) Curve {
	rate := m.Rate[k]
	var constant, slope float64
	var c Curve
	for i, u := range m.Shape[k] {
		if u == 0 {
			continue
		}
		constant += u * drives[i].Constant
		slope += u * drives[i].Slope
		for _, w := range drives[i].Waves {
			// x' = −λ x + cos ωt and + sin ωt, after long times
			d := rate*rate + w.Omega*w.Omega
			c.wave(Wave{w.Omega, u * (rate*w.Cos - w.Omega*w.Sin) / d, u * (w.Omega*w.Cos + rate*w.Sin) / d})
		}
	}
	if rate == 0 {
		c.Constant, c.Slope = x, constant
		return c
	}
	c.Slope = slope / rate
	c.Constant = (constant - c.Slope) / rate
	rest := x - c.Constant
	for _, w := range c.Waves {
		rest -= w.Cos
	}
	c.Decays = []Decay{{rate, rest}}
	return c
}

// ModeAt returns the sizes of the modes at time t.
func (m *Modes) ModeAt(x []float64, drives []Drive, t float64) []float64 {
	after := make([]float64, len(x))
	for k := range x {
		c := m.mode(k, x[k], drives)
		after[k] = c.At(t)
	}
	return after
}

// Rest returns what each node tends to if the constant part of the drives stays and nothing else drives; for
// a part without a leak, its common temperature at sizes x, and its rise per second with the power in it.
func (m *Modes) Rest(x []float64, constant []float64) (temperature, rise []float64) {
	n := len(constant)
	temperature, rise = make([]float64, n), make([]float64, n)
	for k, rate := range m.Rate {
		force := 0.0
		for i, u := range m.Shape[k] {
			force += u * constant[i]
		}
		for i, u := range m.Shape[k] {
			if rate == 0 {
				temperature[i] += u * x[k]
				rise[i] += u * force
			} else {
				temperature[i] += u * force / rate
			}
		}
	}
	return temperature, rise
}

// A Curve is Constant + Slope t + Σ decays + Σ waves.
type Curve struct {
	Constant, Slope float64
	Decays          []Decay
	Waves           []Wave
}

// A Decay is Size exp(−Rate t).
type Decay struct{ Rate, Size float64 }

func (c *Curve) add(factor float64, one *Curve, rate float64) {
	c.Constant += factor * one.Constant
	c.Slope += factor * one.Slope
	for _, d := range one.Decays {
		c.Decays = append(c.Decays, Decay{rate, factor * d.Size})
	}
	for _, w := range one.Waves {
		c.wave(Wave{w.Omega, factor * w.Cos, factor * w.Sin})
	}
}

// wave adds a wave to the one of its frequency.
func (c *Curve) wave(w Wave) {
	for i := range c.Waves {
		if c.Waves[i].Omega == w.Omega {
			c.Waves[i].Cos += w.Cos
			c.Waves[i].Sin += w.Sin
			return
		}
	}
	c.Waves = append(c.Waves, w)
}

// At returns the curve at t ≥ 0.
func (c *Curve) At(t float64) float64 {
	y := c.Constant + c.Slope*t
	for _, d := range c.Decays {
		y += d.Size * math.Exp(-d.Rate*t)
	}
	for _, w := range c.Waves {
		sin, cos := math.Sincos(w.Omega * t)
		y += w.Cos*cos + w.Sin*sin
	}
	return y
}

// Slope0 returns the derivative at t = 0.
func (c *Curve) Slope0() float64 {
	y := c.Slope
	for _, d := range c.Decays {
		y -= d.Rate * d.Size
	}
	for _, w := range c.Waves {
		y += w.Omega * w.Sin
	}
	return y
}

// Largest returns a bound on |curve| over [0, t].
func (c *Curve) Largest(t float64) float64 {
	y := math.Abs(c.Constant)
	if c.Slope != 0 {
		y += math.Abs(c.Slope) * t
	}
	for _, d := range c.Decays {
		y += math.Abs(d.Size)
	}
	for _, w := range c.Waves {
		y += math.Hypot(w.Cos, w.Sin)
	}
	return y
}
