package uncertain

import (
	"fmt"
	"math"
	"slices"
	"strconv"
	"strings"

	"gonum.org/v1/gonum/stat"
	"gonum.org/v1/gonum/stat/distuv"

	"example.com/coolward/units"
)

// A Distribution is what is known of one input: a probability distribution with what it came from.
// Make one with the methods of [Limits], or with [Normal], [StudentT], [Readings] or [Sampled]. A
// distribution that was stated wrongly is refused when the study runs, with an [*units.ArgumentError]
// that names the input.
type Distribution[Q any] struct {
	marginal
	of func(si float64) Q
}

// A marginal is a distribution in SI numbers.
type marginal struct {
	law
	text        string  // for reports
	estimate    float64 // mean
	uncertainty float64 // standard uncertainty in the sense of the GUM
	freedom     float64 // degrees of freedom of that; infinite where it is known
	fault       *units.ArgumentError
}

// A law turns probabilities into values.
type law struct {
	quantile func(u float64) float64 // 0 < u < 1
	normal   func(z float64) float64 // the same for u = Φ(z); nil where it is no shorter than quantile
	gaussian bool
}

// at returns the value for the standard normal z.
func (l law) at(z float64) float64 {
	if l.normal != nil {
		return l.normal(z)
	}
	return l.quantile(probability(distuv.UnitNormal.CDF(z)))
}

// probability keeps u off 0 and 1, where a quantile may be infinite.
func probability(u float64) float64 { return min(max(u, 0x1p-54), 1-0x1p-53) }

// text4 writes a quantity for reports.
func text4(q interface{ Dynamic() units.Value }) string { return fmt.Sprintf("%.4v", q.Dynamic()) }

// spread4 writes a spread in the unit of its estimate.
func spread4(spread, estimate interface{ Dynamic() units.Value }) string {
	p := newPrinter(estimate.Dynamic())
	if p.zero != 0 {
		p.unit = "K"
	}
	return strings.TrimSuffix(strconv.FormatFloat(spread.Dynamic().SI()/p.size, 'g', 4, 64)+" "+p.unit, " ")
}

// Normal is a normal distribution from its mean and its standard uncertainty: a calibration certificate,
// or an earlier evaluation (JCGM 101:2008, 6.4.7).
func Normal[Q Point[Q, S], S Difference[S]](estimate Q, standardUncertainty S) Distribution[Q] {
	d := newDistribution[Q, S](fmt.Sprintf("normal, %s, standard uncertainty %s", text4(estimate), spread4(standardUncertainty, estimate)))
	d.check("estimate", estimate.Dynamic())
	d.checkSpread("standard uncertainty", standardUncertainty)
	d.setNormal(estimate.SI(), standardUncertainty.SI())
	return d
}

// StudentT is the scaled and shifted t-distribution of an estimate whose standard uncertainty itself
// comes from few observations: a certificate that states degrees of freedom, more than 2 (JCGM
// 101:2008, 6.4.9). The propagation of distributions samples it; the linear propagation uses the standard uncertainty and
// the degrees of freedom, as the GUM does.
func StudentT[Q Point[Q, S], S Difference[S]](estimate Q, standardUncertainty S, freedom float64) Distribution[Q] {
	d := newDistribution[Q, S](fmt.Sprintf("Student's t, %s, standard uncertainty %s, %.3g degrees of freedom", text4(estimate), spread4(standardUncertainty, estimate), freedom))
	d.check("estimate", estimate.Dynamic())
	d.checkSpread("standard uncertainty", standardUncertainty)
	d.checkFreedom(freedom)
	d.setStudent(estimate.SI(), standardUncertainty.SI(), freedom)
	return d
}

// Readings is an input that was read repeatedly and independently, four times or more: the mean is the
// estimate, the experimental standard deviation of the mean its standard uncertainty (GUM 4.2.3),
// and the distribution Student's t with one degree of freedom less than there are readings (JCGM
// 101:2008, 6.4.9.2).
func Readings[Q Point[Q, S], S Difference[S]](readings ...Q) Distribution[Q] {
	d := newDistribution[Q, S]("")
	x := d.numbers("readings", dynamic(readings), 4)
	if d.fault != nil {
		return d
	}
	mean, deviation := stat.MeanStdDev(x, nil)
	n := float64(len(x))
	d.text = fmt.Sprintf("Student's t, mean %s of %d readings", text4(d.of(mean)), len(x))
	d.setStudent(mean, deviation/math.Sqrt(n), n-1)
	return d
}

// Sampled is an input that takes the values of a measured sample, each as often as the others: the
// scatter of a population, not the uncertainty of its mean (for that see [Readings]). It needs two values.
func Sampled[Q Point[Q, S], S Difference[S]](values ...Q) Distribution[Q] {
	d := newDistribution[Q, S]("")
	x := d.numbers("sample", dynamic(values), 2)
	if d.fault != nil {
		return d
	}
	slices.Sort(x)
	n := float64(len(x))
	d.text = fmt.Sprintf("sample of %d values, %s to %s", len(x), text4(d.of(x[0])), text4(d.of(x[len(x)-1])))
	d.estimate = stat.Mean(x, nil)
	d.uncertainty = math.Sqrt(stat.PopVariance(x, nil))
	d.quantile = func(u float64) float64 { return x[min(int(u*n), len(x)-1)] }
	return d
}

func newDistribution[Q Point[Q, S], S Difference[S]](text string) Distribution[Q] {
	d := Distribution[Q]{of: builder[Q, S]()}
	d.text, d.freedom = text, math.Inf(1)
	if d.of == nil {
		d.refuse("kind", nil, "a quantity or a temperature of package units, or an uncertain.Number")
	}
	return d
}

// refuse keeps the first fault.
func (m *marginal) refuse(field string, value any, accepted string) {
	if m.fault == nil {
		m.fault = &units.ArgumentError{Field: field, Value: value, Accepted: accepted}
	}
}

func (m *marginal) check(field string, v units.Value) {
	if !v.IsFinite() {
		m.refuse(field, v, "finite")
	}
}

func (m *marginal) checkSpread(field string, spread interface{ Dynamic() units.Value }) {
	if v := spread.Dynamic(); !(v.SI() >= 0) || !v.IsFinite() {
		m.refuse(field, v, "finite and not below 0")
	}
}

func (m *marginal) checkFreedom(freedom float64) {
	if !(freedom > 2 && freedom <= 1e6) {
		m.refuse("degrees of freedom", freedom, "above 2, below which the t-distribution has no standard deviation, to 1e6")
	}
}

// numbers returns the SI numbers of a list of at least n finite points.
func (m *marginal) numbers(field string, values []units.Value, n int) []float64 {
	if len(values) < n {
		m.refuse(field, len(values), fmt.Sprintf("%d values or more", n))
	}
	x := make([]float64, len(values))
	for i, v := range values {
		m.check(field, v)
		x[i] = v.SI()
	}
	return x
}

func dynamic[Q interface{ Dynamic() units.Value }](points []Q) []units.Value {
	values := make([]units.Value, len(points))
	for i, p := range points {
		values[i] = p.Dynamic()
	}
	return values
}

func (m *marginal) setNormal(mean, deviation float64) {
	m.estimate, m.uncertainty, m.gaussian = mean, deviation, true
	m.normal = func(z float64) float64 { return mean + deviation*z }
	m.quantile = distuv.Normal{Mu: mean, Sigma: deviation}.Quantile
}

func (m *marginal) setStudent(mean, deviation, freedom float64) {
	if m.fault != nil {
		return
	}
	m.estimate, m.uncertainty, m.freedom = mean, deviation, freedom
	t := newStudent(freedom)
	m.normal = func(z float64) float64 { return mean + deviation*t.at(z) }
	m.quantile = func(u float64) float64 { return mean + deviation*t.at(distuv.UnitNormal.Quantile(u)) }
}
