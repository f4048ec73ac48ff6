package linear

import (
	"math"

	"example.com/coolward/internal/root"
)

const (
	fading = 1e-13 // part of the decays at which they are taken to be over, where the level is what they tend to
	touch  = 1e-15 // part of the size of a curve that counts as zero: rounding
	most   = 1e6   // intervals; those after are judged by their ends
)

// Crossing returns the first time in [0, end] at which the curve is at the level, and whether there is one. The
// end may be infinite for a curve without waves. It misses no crossing: intervals of time are cut until
// bounds on the second derivative show that the curve has one zero in them, or none; only a curve that runs along the
// level to many digits uses up the intervals there are. A curve that touches the level to rounding
// counts as there.
func (c *Curve) Crossing(level, end float64) (float64, bool) {
	s := search{curve: *c}
	s.curve.Constant -= level
	if math.IsInf(end, 1) {
		end = s.settled()
	}
	s.size = s.curve.Largest(end)
	for _, w := range c.Waves {
		s.waves += math.Hypot(w.Cos, w.Sin)
	}
	fastest := 0.0
	for _, d := range c.Decays {
		fastest = max(fastest, d.Rate)
	}
	from, to := 0.0, end
	if fastest > 0 {
		to = min(0.5/fastest, end)
	}
	for from < end {
		if t, ok := s.in(from, to); ok {
			return t, true
		}
		from, to = to, min(2*to, end)
	}
	return end, s.curve.At(end) == 0
}

// settled returns a time after which the decays are too small for another zero. A slope outlasts them all.
func (s *search) settled() float64 {
	c := &s.curve
	sum := 0.0
	for _, d := range c.Decays {
		sum += math.Abs(d.Size)
	}
	if c.Slope != 0 {
		return min((math.Abs(c.Constant)+sum)/math.Abs(c.Slope)*(1+1e-9), math.MaxFloat64)
	}
	enough := max(math.Abs(c.Constant), fading*sum) / 2
	left := func(t float64) float64 {
		sum := 0.0
		for _, d := range c.Decays {
			sum += math.Abs(d.Size) * math.Exp(-d.Rate*t)
		}
		return sum
	}
	low, high := 0.0, math.MaxFloat64
	for range 100 { // by halves of the logarithm, to a few per cent
		if left(high) > enough || high <= 1.05*low {
			break
		}
		if middle := math.Sqrt(max(low, math.SmallestNonzeroFloat64)) * math.Sqrt(high); left(middle) > enough {
			low = middle
		} else {
			high = middle
		}
	}
	return high
}

type search struct {
	curve Curve
	size  float64 // bound on |curve|
	waves float64 // bound on the waves
	tried int     // intervals
}

// in returns the first zero in [a, b].
func (s *search) in(a, b float64) (float64, bool) {
	s.tried++
	middle, half := a+(b-a)/2, (b-a)/2
	// rise is the derivative times half, turn a bound on the second one times half²: rates may be very high.
	smooth, rise, turn := s.curve.Constant+s.curve.Slope*middle, s.curve.Slope*half, 0.0
	for _, d := range s.curve.Decays {
		first := math.Abs(d.Size) * math.Exp(-d.Rate*a)
		if first == 0 {
			continue
		}
		e := d.Size * math.Exp(-d.Rate*middle)
		smooth += e
		rise -= d.Rate * half * e
		turn += d.Rate * half * first * d.Rate * half
	}
	if math.Abs(smooth)-math.Abs(rise)-turn/2 > s.waves {
		return 0, false
	}
	y := smooth
	for _, w := range s.curve.Waves {
		sin, cos := math.Sincos(w.Omega * middle)
		y += w.Cos*cos + w.Sin*sin
		rise += w.Omega * half * (w.Sin*cos - w.Cos*sin)
		turn += math.Hypot(w.Cos, w.Sin) * w.Omega * half * w.Omega * half
	}
	switch change := math.Abs(rise) + turn/2; {
	case math.Abs(y) > change:
		return 0, false
	case math.Abs(rise) > turn:
		return s.monotone(a, b)
	case change <= touch*s.size || s.tried > most || !(a < middle && middle < b):
		if t, ok := s.monotone(a, b); ok {
			return t, true
		}
		return middle, math.Abs(y) <= touch*s.size
	}
	if t, ok := s.in(a, middle); ok {
		return t, true
	}
	return s.in(middle, b)
}

func (s *search) monotone(a, b float64) (float64, bool) {
	first, last := s.curve.At(a), s.curve.At(b)
	switch {
	case first == 0:
		return a, true
	case last == 0:
		return b, true
	case (first > 0) == (last > 0):
		return 0, false
	}
	return root.Find(s.curve.At, a, b, 0)
}
