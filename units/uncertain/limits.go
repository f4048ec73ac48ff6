package uncertain

import (
	"fmt"
	"math"

	"gonum.org/v1/gonum/stat/distuv"

	"example.com/coolward/units"
)

// Limits say how far an input may lie from what is taken for it. Make them with [PlusMinus], [Between],
// [PerCent] or [WithinFactor]; a method then says how the values are spread within them.
type Limits[Q any] struct {
	of        func(si float64) Q
	si        func(Q) float64
	low, high float64
	text      string
	fault     *units.ArgumentError
}

// PlusMinus states limits as estimate ± half.
func PlusMinus[Q Point[Q, S], S Difference[S]](estimate Q, half S) Limits[Q] {
	d := newDistribution[Q, S]("")
	d.check("estimate", estimate.Dynamic())
	d.checkSpread("half-width", half)
	return newLimits(d, estimate.SI()-half.SI(), estimate.SI()+half.SI(), text4(estimate)+" ± "+spread4(half, estimate))
}

// Between states limits by their ends.
func Between[Q Point[Q, S], S Difference[S]](low, high Q) Limits[Q] {
	d := newDistribution[Q, S]("")
	d.check("lower limit", low.Dynamic())
	d.check("upper limit", high.Dynamic())
	if low.SI() > high.SI() {
		d.refuse("lower limit", low.Dynamic(), "at or below the upper limit of "+high.Dynamic().String())
	}
	return newLimits(d, low.SI(), high.SI(), text4(low)+" to "+text4(high))
}

// PerCent states limits as estimate ± per cent of it.
func PerCent[Q Scalable[Q]](estimate Q, percent float64) Limits[Q] {
	d := newDistribution[Q, Q]("")
	d.check("estimate", estimate.Dynamic())
	if !(percent >= 0 && percent <= math.MaxFloat64) {
		d.refuse("per cent", percent, "finite and not below 0")
	}
	half := math.Abs(estimate.SI()) * percent / 100
	return newLimits(d, estimate.SI()-half, estimate.SI()+half, fmt.Sprintf("%s ± %.4g %%", text4(estimate), percent))
}

// WithinFactor states limits by a relative scatter: from estimate/factor to factor times the estimate. The estimate is
// positive, the factor 1 or more.
func WithinFactor[Q Scalable[Q]](estimate Q, factor float64) Limits[Q] {
	d := newDistribution[Q, Q]("")
	if v := estimate.Dynamic(); !(v.SI() > 0) || !v.IsFinite() {
		d.refuse("estimate", v, "finite and above 0")
	}
	if !(factor >= 1 && factor <= math.MaxFloat64) {
		d.refuse("factor", factor, "finite and 1 or more")
	}
	return newLimits(d, estimate.SI()/factor, estimate.SI()*factor, fmt.Sprintf("%s within a factor of %.4g", text4(estimate), factor))
}

func newLimits[Q interface{ SI() float64 }](d Distribution[Q], low, high float64, text string) Limits[Q] {
	if !(math.Abs(high-low) <= math.MaxFloat64) {
		d.refuse("limits", text, "limits whose ends and width are finite")
	}
	return Limits[Q]{of: d.of, si: Q.SI, low: low, high: high, text: text, fault: d.fault}
}

func (l Limits[Q]) distribution(shape string) Distribution[Q] {
	d := Distribution[Q]{of: l.of}
	d.text, d.freedom, d.fault = shape+", "+l.text, math.Inf(1), l.fault
	d.estimate = l.centre()
	if l.of == nil {
		d.refuse("limits", nil, "limits of PlusMinus, Between, PerCent or WithinFactor")
	}
	return d
}

func (l Limits[Q]) centre() float64 { return l.low + l.half() }
func (l Limits[Q]) half() float64   { return (l.high - l.low) / 2 }

// Rectangular spreads the values evenly: nothing is known but the limits (GUM 4.3.7; JCGM 101:2008, 6.4.2).
func (l Limits[Q]) Rectangular() Distribution[Q] {
	d := l.distribution("rectangular")
	d.uncertainty = l.half() / math.Sqrt(3)
	low, width := l.low, l.high-l.low
	d.quantile = func(u float64) float64 { return low + width*u }
	return d
}

// Triangular makes the middle the likeliest value (GUM 4.3.9; JCGM 101:2008, 6.4.5).
func (l Limits[Q]) Triangular() Distribution[Q] { return l.triangular(l.centre()) }

// TriangularAt makes the given value the likeliest one; it lies within the limits.
func (l Limits[Q]) TriangularAt(likeliest Q) Distribution[Q] {
	if l.si == nil {
		return l.distribution("triangular")
	}
	mode := l.si(likeliest)
	if !(mode >= l.low && mode <= l.high) && l.fault == nil {
		l.fault = &units.ArgumentError{Field: "likeliest value", Value: likeliest, Accepted: "within the limits " + l.text}
	}
	return l.triangular(mode)
}

func (l Limits[Q]) triangular(mode float64) Distribution[Q] {
	d := l.distribution("triangular")
	width := l.high - l.low
	if d.fault != nil || width == 0 {
		d.quantile = func(float64) float64 { return l.low }
		return d
	}
	unit := distuv.NewTriangle(0, 1, min(max((mode-l.low)/width, 0), 1), nil)
	d.estimate = l.low + width*unit.Mean()
	d.uncertainty = width * unit.StdDev()
	d.quantile = func(u float64) float64 { return l.low + width*unit.Quantile(u) }
	return d
}

// Trapezoidal spreads the values evenly over the middle, top times the width of the whole, and lets them become rarer
// towards the limits; top is from 0, triangular, to 1, rectangular (GUM 4.3.9; JCGM 101:2008, 6.4.4).
func (l Limits[Q]) Trapezoidal(top float64) Distribution[Q] {
	d := l.distribution("trapezoidal")
	if !(top >= 0 && top <= 1) {
		d.refuse("top of the trapezoid", top, "from 0 to 1")
	}
	half := l.half()
	d.uncertainty = half * math.Sqrt((1+top*top)/6)
	d.quantile = func(u float64) float64 { return l.centre() + half*trapezoid(u, top) }
	return d
}

// trapezoid is the quantile of the symmetric trapezoid on -1 to 1, which is quadratic over its slopes
// and linear over its top.
func trapezoid(u, top float64) float64 {
	slope := (1 - top) / (1 + top) / 2 // the probability of one slope
	switch {
	case u < slope:
		return -1 + math.Sqrt(2*u*(1-top*top))
	case u > 1-slope:
		return 1 - math.Sqrt(2*(1-u)*(1-top*top))
	}
	return (2*u - 1) * (1 + top) / 2
}

// ArcSine is for an input that swings between the limits as a sine does, and is met at any moment: the
// air of a room whose cooling cycles (JCGM 101:2008, 6.4.6).
func (l Limits[Q]) ArcSine() Distribution[Q] {
	d := l.distribution("arc sine")
	half := l.half()
	d.uncertainty = half / math.Sqrt2
	d.quantile = func(u float64) float64 { return l.centre() + half*math.Sin(math.Pi*(u-0.5)) }
	return d
}

// Normal takes the limits for the ends of the coverage interval of a normal distribution with the given
// probability, such as 0.95 (GUM 4.3.4).
func (l Limits[Q]) Normal(coverage float64) Distribution[Q] {
	d := l.distribution(fmt.Sprintf("normal with %.4g %%", 100*coverage))
	k := d.factor(coverage)
	d.setNormal(l.centre(), l.half()/k)
	return d
}

// LogNormal takes the limits, which are positive, for the ends of the coverage interval of a log-normal
// distribution with the given probability. Their geometric mean is the median: the distribution for a
// relative scatter, and for what cannot be negative.
func (l Limits[Q]) LogNormal(coverage float64) Distribution[Q] {
	d := l.distribution(fmt.Sprintf("log-normal with %.4g %%", 100*coverage))
	if !(l.low > 0) {
		d.refuse("lower limit", l.low, "above 0, in SI units, for a log-normal distribution")
	}
	k := d.factor(coverage)
	if d.fault != nil {
		return d
	}
	mu := (math.Log(l.low) + math.Log(l.high)) / 2
	sigma := (math.Log(l.high) - math.Log(l.low)) / 2 / k
	law := distuv.LogNormal{Mu: mu, Sigma: sigma}
	d.estimate = math.Exp(mu + sigma*sigma/2)
	d.uncertainty = d.estimate * math.Sqrt(math.Expm1(sigma*sigma))
	if !(d.uncertainty <= math.MaxFloat64) {
		d.refuse("limits", l.text, "a factor whose standard deviation is finite")
	}
	d.normal = func(z float64) float64 { return math.Exp(mu + sigma*z) }
	d.quantile = law.Quantile
	return d
}

// factor returns the coverage factor of a normal distribution.
func (m *marginal) factor(coverage float64) float64 {
	if !(coverage > 0 && coverage < 1) {
		m.refuse("coverage probability", coverage, "above 0 and below 1")
		return 1
	}
	return distuv.UnitNormal.Quantile(probability((1 + coverage) / 2))
}
