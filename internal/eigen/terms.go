package eigen

import "math"

// Join is the Fourier number from which the series of eigenfunctions is summed. There the first
// image left out by the short-time form is below exp(−40), and the series needs 14 terms at most.
const Join = 0.025

// Terms is how many terms of the series are kept. From Join on no further one is needed: for a sphere
// ζ_15 > 14π, so that (ζ_15² − ζ_1²) Join > 48, which is more than negligible.
const Terms = 14

// negligible is the exponent by which a term must have decayed more than the first to be left out.
const negligible = 45

// row holds one number for each term.
type row [Terms]float64

// sum returns Σ c_n exp(−rate_n Fo), where rate_n = ζ_n². A first rate of 0 stands for a body that
// exchanges no heat.
func sum(c, rate []float64, fo float64) float64 {
	if rate[0] == 0 {
		return c[0]
	}
	total := 0.0
	for n := range c {
		if (rate[n]-rate[0])*fo > negligible {
			break
		}
		total += c[n] * math.Exp(-rate[n]*fo)
	}
	return total
}

// rounding bounds what rounding does to θ, in absolute terms: some four times what the comparison
// with values of many digits shows at random Biot and Fourier numbers and places.
const rounding = 5e-15

// errorBound bounds the error of θ for a body whose first rate is given. A series leaves out terms of
// at most 2 exp(−rate_n Fo) of which the first is below exp(−negligible) of the first of all and each
// further one below 0.04 of the one before; the images left out come to less than 2 exp(−1/Fo).
func errorBound(firstRate, fo float64) float64 {
	if fo < Join {
		return 2*math.Exp(-1/fo) + rounding
	}
	return 3*math.Exp(-negligible-firstRate*fo) + roundingLate(firstRate, fo)
}

// roundingLate is rounding less what has decayed: the first coefficient is 2 at most, and the rounding of the
// exponent grows with it.
func roundingLate(firstRate, fo float64) float64 {
	exponent := firstRate * fo
	if exponent > 1000 {
		return math.SmallestNonzeroFloat64
	}
	return rounding * math.Min(1, 2*(1+exponent)*math.Exp(-exponent))
}

// unit takes a rounding error beyond 0 or 1 off a value that cannot be there.
func unit(theta float64) float64 { return math.Max(0, math.Min(1, theta)) }
