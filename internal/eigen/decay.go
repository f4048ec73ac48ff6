package eigen

import "math"

// The sums of the series need functions to an absolute error of 1e-16 at many arguments. Those below take a value
// from a table and a short polynomial for the rest of the argument, in half the time of package math.

const (
	decaySteps = 128
	decayHigh  = 0x1.62e42feep-08 // ln 2/128 to 32 bits, so that a multiple of it is exact
	decayLow   = 0x1.a39ef35793c76p-40
)

// decayTable holds 2^(i/128).
var decayTable = func() (table [decaySteps]float64) {
	for i := range table {
		table[i] = math.Exp2(float64(i) / decaySteps)
	}
	return table
}()

// decay returns e^{−a}, good to two units in the last place for 0 ≤ a ≤ decayEnd.
func decay(a float64) float64 {
	if !(a >= 0 && a <= decayEnd) {
		return math.Exp(-a)
	}
	return raised(parted(a))
}

// decayEnd is where decay ends to be a normal float64.
const decayEnd = 700

// parted returns k and r with e^{−a} = 2^{−k/128} e^r for 0 ≤ a ≤ decayEnd, and raised that value; both are short
// enough to be put in line by the compiler.
func parted(a float64) (k int, r float64) {
	k = int(a*(decaySteps/math.Ln2) + 0.5)
	steps := float64(k)
	return k, (steps*decayHigh - a) + steps*decayLow
}

func raised(k int, r float64) float64 {
	s := r * r
	power := decayTable[-k&(decaySteps-1)]
	power += power * (r + s*(0.5+r*(1.0/6)+s*(1.0/24+r*(1.0/120))))
	return math.Float64frombits(math.Float64bits(power) - uint64(k+decaySteps-1)/decaySteps<<52)
}
