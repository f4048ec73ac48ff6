package lumped

import (
	"fmt"
	"math"

	"example.com/coolward/internal/fit"
	"example.com/coolward/units"
)

// An Estimate is what readings say of a quantity. From Low to High is its confidence interval, which need not
// be symmetric. On an open side the readings put no bound, and Low or High is zero. Where there are no
// more readings than constants and no noise is stated, both sides are open and the standard error is zero.
type Estimate[Q, S any] struct {
	Value             Q
	StandardError     S // of the model made linear; the interval does without that
	Low, High         Q
	OpenLow, OpenHigh bool
}

// String writes the estimate with its interval.
func (e Estimate[Q, S]) String() string {
	switch {
	case e.OpenLow && e.OpenHigh:
		return fmt.Sprintf("%v, no bounds known", e.Value)
	case e.OpenLow:
		return fmt.Sprintf("%v, at most %v", e.Value, e.High)
	case e.OpenHigh:
		return fmt.Sprintf("%v, at least %v", e.Value, e.Low)
	}
	return fmt.Sprintf("%v, from %v to %v", e.Value, e.Low, e.High)
}

// TimeConstant returns τ of T = T∞ + (T0 − T∞) exp(−t/τ), with its interval.
func (s *Fitted) TimeConstant() (Estimate[units.Duration, units.Duration], error) {
	e := Estimate[units.Duration, units.Duration]{OpenLow: true, OpenHigh: true}
	if err := s.check(); err != nil {
		return e, err
	}
	e.Value = units.Second.Of(s.curve.Tau)
	if !s.sure {
		return e, nil
	}
	e.StandardError = e.Value.Scale(s.spread())
	i := s.profile().Tau()
	e.OpenLow, e.OpenHigh = i.OpenLow, i.OpenHigh
	if !i.OpenLow {
		e.Low = units.Second.Of(math.Exp(i.Low))
	}
	if !i.OpenHigh {
		e.High = units.Second.Of(math.Exp(i.High))
	}
	return e, units.CheckFinite("standard error of the time constant", e.StandardError)
}

// Coefficient returns h = C/(A τ). It returns an [*units.ArgumentError] unless heat capacity and area were stated.
func (s *Fitted) Coefficient() (Estimate[units.HeatTransferCoefficient, units.HeatTransferCoefficient], error) {
	h := Estimate[units.HeatTransferCoefficient, units.HeatTransferCoefficient]{OpenLow: true, OpenHigh: true}
	tau, err := s.TimeConstant()
	if err != nil {
		return h, err
	}
	if err := units.CheckPositive("fit: heat capacity", s.fit.Capacity); err != nil {
		return h, err
	}
	if err := units.CheckPositive("fit: area", s.fit.Area); err != nil {
		return h, err
	}
	of := func(t units.Duration) units.HeatTransferCoefficient {
		return units.WattPerSquareMetreKelvin.Of(s.fit.Capacity.SI() / s.fit.Area.SI() / t.SI())
	}
	h.Value = of(tau.Value)
	h.StandardError = h.Value.Scale(tau.StandardError.Ratio(tau.Value))
	h.OpenLow, h.OpenHigh = tau.OpenHigh, tau.OpenLow
	if !h.OpenLow {
		h.Low = of(tau.High)
	}
	if !h.OpenHigh {
		h.High = of(tau.Low)
	}
	for _, x := range []units.HeatTransferCoefficient{h.Value, h.StandardError, h.Low, h.High} {
		if err := units.CheckFinite("fit: heat transfer coefficient", x); err != nil {
			return h, err
		}
	}
	return h, nil
}

// Initial returns the temperature at the first time of the log; if it was stated, the statement.
func (s *Fitted) Initial() (Estimate[units.Temperature, units.TemperatureDifference], error) {
	if err := s.check(); err != nil {
		return Estimate[units.Temperature, units.TemperatureDifference]{OpenLow: true, OpenHigh: true}, err
	}
	return s.value(0)
}

// Ambient returns the temperature that the curve tends to; if it was stated, the statement. It may have been
// found without being known: see [Fitted.AmbientIdentified].
func (s *Fitted) Ambient() (Estimate[units.Temperature, units.TemperatureDifference], error) {
	if err := s.check(); err != nil {
		return Estimate[units.Temperature, units.TemperatureDifference]{OpenLow: true, OpenHigh: true}, err
	}
	return s.value(math.Inf(1))
}

// AmbientIdentified reports whether the readings bend enough to tell the ambient: its interval has two
// ends and is narrower than the span of the readings. A stated ambient is identified.
func (s *Fitted) AmbientIdentified() bool {
	if s.check() != nil {
		return false
	}
	if s.fit.Ambient != (units.Temperature{}) {
		return true
	}
	a, err := s.Ambient()
	if err != nil || a.OpenLow || a.OpenHigh {
		return false
	}
	return a.High.Sub(a.Low).SI() < s.span()
}

// span returns the highest less the lowest reading.
func (s *Fitted) span() float64 {
	low, high := math.Inf(1), math.Inf(-1)
	for _, T := range s.kelvin {
		low, high = min(low, T), max(high, T)
	}
	return high - low
}

// Correlations returns the coefficients of correlation of what was found, in the order time constant, initial
// temperature, ambient temperature, without those that were stated; with the standard errors they are
// the covariance. There are none where no standard error is known.
func (s *Fitted) Correlations() [][]float64 {
	if s.check() != nil || !s.sure {
		return nil
	}
	n := s.covariance.SymmetricDim()
	r := make([][]float64, n)
	for i := range r {
		r[i] = make([]float64, n)
		for j := range r[i] {
			r[i][j] = 1
			if i != j {
				r[i][j] = s.covariance.At(i, j) / math.Sqrt(s.covariance.At(i, i)*s.covariance.At(j, j))
			}
		}
	}
	return r
}

// Deviation returns the standard deviation of a reading from the curve: the stated noise, or what was found
// with Freedom degrees of freedom. There is none with as many constants as readings.
func (s *Fitted) Deviation() (deviation units.TemperatureDifference, freedom int, ok bool) {
	if s.check() != nil || s.freedom == 0 && s.fit.Noise.SI() == 0 {
		return units.TemperatureDifference{}, 0, false
	}
	return units.KelvinDifference.Of(s.deviation), s.freedom, true
}

// value returns the curve a time after the first of the log, which may be infinite.
func (s *Fitted) value(t float64) (Estimate[units.Temperature, units.TemperatureDifference], error) {
	y := s.curve.At(t)
	e := Estimate[units.Temperature, units.TemperatureDifference]{Value: s.temperature(y), OpenLow: true, OpenHigh: true}
	stated := t == 0 && s.fit.Initial != (units.Temperature{}) || math.IsInf(t, 1) && s.fit.Ambient != (units.Temperature{})
	if stated {
		e.OpenLow, e.OpenHigh = false, false
		e.Low, e.High = e.Value, e.Value
		return e, nil
	}
	if !s.sure {
		return e, nil
	}
	se := s.errorAt(t)
	e.StandardError = units.KelvinDifference.Of(se)
	i := fit.Interval{Low: y, High: y}
	if se > 0 {
		i = s.profile().Value(t, se)
	}
	e.OpenLow, e.OpenHigh = i.OpenLow, i.OpenHigh
	if !i.OpenLow {
		e.Low = s.temperature(i.Low)
	}
	if !i.OpenHigh {
		e.High = s.temperature(i.High)
	}
	return e, units.CheckFinite("standard error of a temperature", e.StandardError)
}

func (s *Fitted) temperature(y float64) units.Temperature { return units.Kelvin.Of(y + s.reference) }

// errorAt returns the standard error of the curve.
func (s *Fitted) errorAt(t float64) float64 {
	return math.Sqrt(max(s.problem.Variance(s.curve, s.covariance, t), 0))
}

// spread returns the standard error of ln τ.
func (s *Fitted) spread() float64 { return math.Sqrt(s.covariance.At(0, 0)) }

func (s *Fitted) profile() *fit.Profile {
	return &fit.Profile{
		Problem: s.problem, Best: s.curve, Spread: s.spread(),
		Level: s.curve.Squares + math.Pow(s.factor*s.deviation, 2),
	}
}

func (s *Fitted) check() error {
	if s == nil || s.problem == nil {
		return &units.ArgumentError{Field: "fitted curve", Accepted: "one that Fit.Solve returned"}
	}
	return nil
}
