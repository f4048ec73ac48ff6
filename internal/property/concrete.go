package property

// Concrete is normal-weight concrete by EN 1992-1-2:2004, clause 3.3, from memory.
type Concrete struct {
	limit [3]float64 // conductivity as a polynomial of t/100 °C
	peak  float64    // J/(kg K), of moist concrete between 100 °C and 115 °C; 0 for dry concrete
}

// NewConcrete returns concrete with a conductivity between the lower limit 1.36 − 0.136 x + 0.0057 x² (upper = 0) and
// the upper limit 2 − 0.2451 x + 0.0107 x² (upper = 1), x = t/100 °C, and with the moisture u by mass,
// from 0 to 0.03.
func NewConcrete(upper, u float64) Concrete {
	high, low := [3]float64{2, -0.2451, 0.0107}, [3]float64{1.36, -0.136, 0.0057}
	c := Concrete{peak: peakOf(u)}
	for i := range c.limit {
		c.limit[i] = upper*high[i] + (1-upper)*low[i]
	}
	return c
}

// peakOf returns the specific heat between 100 °C and 115 °C: 900, 1470 and 2020 J/(kg K) for 0, 1.5 % and 3 % of
// moisture, and straight lines between. It returns 0 for dry concrete.
func peakOf(u float64) float64 {
	switch {
	case u == 0:
		return 0
	case u < 0.015:
		return 900 + (1470-900)*(u/0.015)
	}
	return 1470 + (2020-1470)*((u-0.015)/0.015)
}

// Conductivity returns the polynomial.
func (c Concrete) Conductivity(t float64) float64 {
	x := (t - zeroCelsius) / 100
	return c.limit[0] + x*(c.limit[1]+x*c.limit[2])
}

// SpecificHeat returns the dry curve, or that with the peak, which goes down to the dry curve by a straight line from
// 115 °C to 200 °C.
func (c Concrete) SpecificHeat(t float64) float64 {
	t -= zeroCelsius
	switch {
	case t <= 100:
		return 900
	case t < 115 && c.peak > 0:
		return c.peak
	case t < 200 && c.peak > 0:
		return c.peak + (1000-c.peak)*((t-115)/85)
	case t < 200:
		return 900 + (t - 100)
	case t < 400:
		return 1000 + (t-200)/2
	}
	return 1100
}

// Enthalpy is the exact integral of the pieces, zero at 0 °C.
func (c Concrete) Enthalpy(t float64) float64 {
	t -= zeroCelsius
	at200 := 185000.0
	if c.peak > 0 {
		at200 = 90000 + 15*c.peak + 85*(c.peak+1000)/2
	}
	switch {
	case t < 100:
		return 900 * t
	case t < 115 && c.peak > 0:
		return 90000 + c.peak*(t-100)
	case t < 200 && c.peak > 0:
		x := t - 115
		return 90000 + 15*c.peak + x*(c.peak+(1000-c.peak)*(x/170))
	case t < 200:
		x := t - 100
		return 90000 + x*(900+x/2)
	case t < 400:
		x := t - 200
		return at200 + x*(1000+x/4)
	}
	return at200 + 210000 + 1100*(t-400)
}
