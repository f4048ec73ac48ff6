package lumped

import (
	"fmt"
	"math"

	"gonum.org/v1/gonum/mat"

	"example.com/coolward/units"
)

// Indicated returns what the sensor would have written for a log of the true temperature, straight from
// reading to reading, at the same times. At the first reading the sensor shows the truth. Missing
// readings are passed over. It returns the errors of [Log.Check].
func (s Sensor) Indicated(truth Log) (Log, error) {
	if err := s.Check(); err != nil {
		return Log{}, err
	}
	if err := truth.Check(); err != nil {
		return Log{}, err
	}
	seconds, kelvin, place := truth.present()
	shown := truth.copy()
	if len(seconds) == 1 {
		return shown, nil
	}
	horizon := units.Second.Of(seconds[len(seconds)-1] - seconds[0])
	follow, err := s.Follow(truth.Course(), units.Kelvin.Of(kelvin[0]), horizon)
	if err != nil {
		return Log{}, err
	}
	for i, at := range place {
		T, err := follow.At(Element, units.Second.Of(min(seconds[i]-seconds[0], follow.end)))
		if err != nil {
			return Log{}, err
		}
		shown.Temperatures[at] = T
	}
	return shown, nil
}

// A Correction is a log without the lag of a sensor.
type Correction struct {
	Log Log

	// NoiseGain is, for each reading, by how much the standard deviation of independent errors of the readings
	// is larger in the corrected log; NaN is never among them: it is 0 where the reading is missing.
	NoiseGain []float64
}

// Corrected returns the temperature of the medium from a log of what the sensor showed: T + τ dT/dt, and for a sensor in
// a sheath T + (τ1 + τ2) dT/dt + τ1 τ2 d²T/dt². Value and derivatives are those of the parabola of least
// squares through the readings within half the width before and after (A. Savitzky, M. J. E. Golay, Analytical
// Chemistry 36 (1964) 1627–1639, from memory; here for unequal times too). Where there are fewer than three readings in
// the width, the three nearest are taken; with a width of 0 always, without any smoothing.
//
// A correction makes noise larger, the more the shorter the width is beside the time constants; a width that is long beside
// the changes of the temperature hides them. The noise gain says the first for each reading. It returns
// the errors of [Log.Check], and an [*units.ArgumentError] for fewer than three readings.
func (s Sensor) Corrected(shown Log, width units.Duration) (Correction, error) {
	if err := s.Check(); err != nil {
		return Correction{}, err
	}
	if err := shown.Check(); err != nil {
		return Correction{}, err
	}
	if err := units.CheckNotNegative("width of the smoothing", width); err != nil {
		return Correction{}, err
	}
	seconds, kelvin, place := shown.present()
	if len(seconds) < 3 {
		return Correction{}, &units.ArgumentError{Field: "log: readings", Value: fmt.Sprintf("%d that are not missing", len(seconds)), Accepted: "3 or more"}
	}
	sum, product := s.lags()
	c := Correction{Log: shown.copy(), NoiseGain: make([]float64, len(shown.Times))}
	for i, at := range place {
		first, last := neighbours(seconds, i, width.SI()/2)
		weights, ok := parabola(seconds[first:last], seconds[i], sum, product)
		value, gain := 0.0, 0.0
		for k, w := range weights {
			value += w * (kelvin[first+k] - kelvin[i])
			gain += w * w
		}
		T := units.Kelvin.Of(kelvin[i] + value)
		if !ok || !isFinite(gain) {
			return Correction{}, &units.ArgumentError{Field: fmt.Sprintf("log: times around reading %d", at+1), Value: shown.Times[at], Accepted: "times that are not so close together beside the lag of the sensor"}
		}
		if err := units.CheckTemperature(fmt.Sprintf("corrected reading %d", at+1), T); err != nil {
			return Correction{}, err
		}
		c.Log.Temperatures[at], c.NoiseGain[at] = T, math.Sqrt(gain)
	}
	return c, nil
}

// neighbours returns the readings first to before last within half a width of reading i, at least the three
// nearest.
func neighbours(times []float64, i int, half float64) (first, last int) {
	first, last = i, i+1
	for {
		before, behind := math.Inf(1), math.Inf(1)
		if first > 0 {
			before = times[i] - times[first-1]
		}
		if last < len(times) {
			behind = times[last] - times[i]
		}
		nearest := min(before, behind)
		if math.IsInf(nearest, 1) || nearest > half && last-first >= 3 {
			return first, last
		}
		if before <= behind {
			first--
		} else {
			last++
		}
	}
}

// parabola returns the weights w for which Σ w T is value + sum slope + product curvature at time at of the
// parabola of least squares.
func parabola(times []float64, at, sum, product float64) (weights []float64, ok bool) {
	width := 0.0
	for _, t := range times {
		width = max(width, math.Abs(t-at))
	}
	// Σ over the readings of the powers of x = (t − at)/width, up to the fourth.
	var powers [5]float64
	for _, t := range times {
		p := 1.0
		for n := range powers {
			powers[n] += p
			p *= (t - at) / width
		}
	}
	normal := mat.NewSymDense(3, nil)
	for i := range 3 {
		for j := i; j < 3; j++ {
			normal.SetSym(i, j, powers[i+j])
		}
	}
	var c mat.Cholesky
	var b mat.VecDense
	if !c.Factorize(normal) || c.SolveVecTo(&b, mat.NewVecDense(3, []float64{1, sum / width, 2 * product / width / width})) != nil {
		return nil, false
	}
	for _, t := range times {
		x := (t - at) / width
		weights = append(weights, b.AtVec(0)+x*(b.AtVec(1)+x*b.AtVec(2)))
	}
	return weights, true
}
