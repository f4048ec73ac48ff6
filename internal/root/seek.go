package root

import (
	"errors"
	"math"
)

// ErrNoZero reports that a function changed its sign without a zero.
var ErrNoZero = errors.New("the function changes sign without a zero")

// Seek walks from a to stop, in a first step of the given length and then in steps that grow by half,
// until f has changed its sign, and returns the zero there, to within tolerance, with true. Two zeros closer
// together than a step are passed over. If there is none before stop, it returns stop and false. An error of f
// ends it, with how far it had come.
func Seek(f func(float64) (float64, error), a, stop, step, tolerance float64) (at float64, found bool, err error) {
	fa, err := f(a)
	if err != nil || fa == 0 {
		return a, err == nil, err
	}
	for step = math.Copysign(step, stop-a); a != stop; step *= 1.5 {
		b := a + step
		if !((stop-b)*step > 0) {
			b = stop
		}
		fb, err := f(b)
		if err != nil {
			return a, false, err
		}
		if fb == 0 {
			return b, true, nil
		}
		if (fb > 0) != (fa > 0) {
			return between(f, a, fa, b, fb, tolerance)
		}
		a, fa = b, fb
	}
	return stop, false, nil
}

// between returns the zero between a and b, where f has the values fa and fb of opposite sign.
func between(f func(float64) (float64, error), a, fa, b, fb, tolerance float64) (float64, bool, error) {
	var failure error
	x, ok := Find(func(x float64) float64 {
		switch x {
		case a:
			return fa
		case b:
			return fb
		}
		y, err := f(x)
		if err != nil {
			failure, y = err, math.NaN()
		}
		return y
	}, a, b, tolerance)
	switch {
	case failure != nil:
		return a, false, failure
	case !ok:
		return a, false, ErrNoZero
	}
	return x, true, nil
}
