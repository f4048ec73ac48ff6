package eigen

import "math"

const (
	circleSteps = 128
	circleHigh  = 0x1.921fb544p-5 // π/64 to 33 bits
	circleLow   = 0x1.0b4611a626331p-39
	circleEnd   = 1e4
)

// circle holds cosine and sine of i π/64.
var circle = func() (table [circleSteps]struct{ cos, sin float64 }) {
	const quarter = circleSteps / 4
	for i := range quarter { // from angles of an eighth of the circle, which are rounded least
		sin, cos := math.Sincos(float64(min(i, quarter-i)) * (2 * math.Pi / circleSteps))
		if 2*i > quarter {
			sin, cos = cos, sin
		}
		table[i].cos, table[i].sin = cos, sin
		table[i+quarter].cos, table[i+quarter].sin = -sin, cos
		table[i+2*quarter].cos, table[i+2*quarter].sin = -cos, -sin
		table[i+3*quarter].cos, table[i+3*quarter].sin = sin, -cos
	}
	return table
}()

// cosine returns cos z with an absolute error of 2e-16, for z ≥ 0.
func cosine(z float64) float64 {
	if !(z >= 0 && z <= circleEnd) {
		return math.Cos(z)
	}
	k := int(z*(circleSteps/(2*math.Pi)) + 0.5)
	r := (z - float64(k)*circleHigh) - float64(k)*circleLow
	square := r * r
	versed := square * (0.5 - square*(1.0/24-square*(1.0/720)))
	sin := r - r*square*(1.0/6-square*(1.0/120-square*(1.0/5040)))
	at := &circle[k&(circleSteps-1)]
	return at.cos - (at.cos*versed + at.sin*sin)
}

// sine returns sin z with an absolute error of 2e-16, and relatively where z is small, for z ≥ 0.
func sine(z float64) float64 {
	if !(z >= 0 && z <= circleEnd) {
		return math.Sin(z)
	}
	k := int(z*(circleSteps/(2*math.Pi)) + 0.5)
	r := (z - float64(k)*circleHigh) - float64(k)*circleLow
	square := r * r
	versed := square * (0.5 - square*(1.0/24-square*(1.0/720)))
	sin := r - r*square*(1.0/6-square*(1.0/120-square*(1.0/5040)))
	at := &circle[k&(circleSteps-1)]
	return at.sin + (at.cos*sin - at.sin*versed)
}
