package uncertain

import (
	"fmt"
	"math"
	"strconv"
	"sync/atomic"

	"gonum.org/v1/gonum/stat/distuv"

	"example.com/coolward/units"
)

// A Linear is the answer of the law of propagation of uncertainty (JCGM 100:2008, the GUM, 5.1.2 and 5.2.2): the
// model at the estimates, and what each input adds if the model were linear over its uncertainty.
type Linear[Q, S any] struct {
	Estimate            Q                 `json:"estimate"`            // the model at the estimates of the inputs
	StandardUncertainty S                 `json:"standardUncertainty"` // combined, with the correlations
	Low                 Q                 `json:"low"`                 // Estimate less the expanded uncertainty
	High                Q                 `json:"high"`
	Coverage            float64           `json:"coverage"`
	CoverageFactor      float64           `json:"coverageFactor"`
	Freedom             Freedom           `json:"degreesOfFreedom"` // effective, by Welch and Satterthwaite (GUM G.4.1); infinite with correlated inputs
	Contributions       []Contribution[S] `json:"contributions"`    // in the order of the study
	Inputs              []Stated          `json:"inputs"`
	digits              int
}

// Freedom is a number of degrees of freedom; it may be infinite, which is written as a text.
type Freedom float64

// MarshalText writes the number, or "infinite".
func (f Freedom) MarshalText() ([]byte, error) {
	if math.IsInf(float64(f), 1) {
		return []byte("infinite"), nil
	}
	return strconv.AppendFloat(nil, float64(f), 'g', -1, 64), nil
}

// A Contribution is what one input adds: the sensitivity coefficient times the standard uncertainty of the input, with
// its sign.
type Contribution[S any] struct {
	Input  string `json:"input"`
	Change S      `json:"change"`
}

// Linearise propagates the standard uncertainties of a study linearly. The sensitivity coefficients are central
// differences of one standard uncertainty each (GUM 5.1.3, note 2), so that the model is evaluated twice for each
// input and once at the estimates. The coverage factor is that of Student's t with the effective degrees of freedom,
// truncated to an integer (GUM G.4.1 and G.6.4), or of the normal distribution where they are infinite.
//
// It returns the error of the model, with the input that was changed, and an [*units.ArgumentError] as
// [Propagate] does. Whether the result can be trusted is for [Validate] to say.
func Linearise[Q Point[Q, S], S Difference[S]](s *Study, model func(Draw) (Q, error)) (l Linear[Q, S], err error) {
	c, err := s.check()
	if err != nil {
		return l, err
	}
	point, one := builder[Q, S](), unit[S]()
	switch {
	case model == nil:
		return l, &units.ArgumentError{Field: "model", Accepted: "a function of a draw"}
	case point == nil:
		return l, unknownKind("answer")
	}
	defer func() {
		if p := recover(); p != nil {
			err = panicked(p)
		}
	}()
	lin, err := linearise(c, func(x Draw) (float64, error) { return number(model(x)) })
	if err != nil {
		return l, err
	}
	l = Linear[Q, S]{
		Estimate: point(lin.estimate), StandardUncertainty: one.Scale(lin.uncertainty),
		Low: point(lin.estimate - lin.expanded), High: point(lin.estimate + lin.expanded),
		Coverage: c.coverage, CoverageFactor: lin.factor, Freedom: Freedom(lin.freedom),
		Inputs: stated(c.specs), digits: c.digits,
	}
	for j, d := range lin.changes {
		l.Contributions = append(l.Contributions, Contribution[S]{c.specs[j].name, one.Scale(d)})
	}
	return l, nil
}

// A linear is a [Linear] in SI numbers.
type linear struct {
	estimate, uncertainty, freedom, factor, expanded float64
	changes                                          []float64
}

func linearise(c settings, model func(Draw) (float64, error)) (linear, error) {
	l := linear{changes: make([]float64, len(c.specs)), freedom: math.Inf(1)}
	var foreign atomic.Pointer[units.ArgumentError]
	row := make([]float64, len(c.specs))
	at := func(changed int, by float64) (float64, error) {
		for j, in := range c.specs {
			row[j] = in.estimate
		}
		if changed >= 0 {
			row[changed] += by
		}
		y, err := model(Draw{row, c.specs, &foreign})
		if fault := foreign.Load(); fault != nil {
			return y, fault
		}
		return y, err
	}
	var err error
	if l.estimate, err = at(-1, 0); err != nil {
		return l, fmt.Errorf("at the estimates: %w", err)
	}
	for j, in := range c.specs {
		if in.uncertainty == 0 {
			continue
		}
		above, err := at(j, in.uncertainty)
		if err != nil {
			return l, fmt.Errorf("input %q one standard uncertainty above its estimate: %w", in.name, err)
		}
		below, err := at(j, -in.uncertainty)
		if err != nil {
			return l, fmt.Errorf("input %q one standard uncertainty below its estimate: %w", in.name, err)
		}
		l.changes[j] = (above - below) / 2
	}
	l.combine(c)
	if !(math.Abs(l.estimate)+l.expanded <= math.MaxFloat64) {
		return l, errNotFinite
	}
	return l, nil
}

// combine adds the contributions with their correlations (GUM 5.2.2, equation 13; G.4.1, equation G.2b).
func (l *linear) combine(c settings) {
	largest := 0.0
	for _, d := range l.changes {
		largest = max(largest, math.Abs(d))
	}
	p := (1 + c.coverage) / 2
	l.factor = distuv.UnitNormal.Quantile(p)
	if largest == 0 {
		return
	}
	square, fourth := 0.0, 0.0
	for i, a := range l.changes {
		for j, b := range l.changes {
			square += a / largest * (b / largest) * c.product.At(i, j)
		}
		fourth += math.Pow(a/largest, 4) / c.specs[i].freedom
	}
	square = max(square, 0)
	l.uncertainty = largest * math.Sqrt(square)
	if fourth > 0 && len(c.groups) == len(c.specs) {
		l.freedom = square * square / fourth
		l.factor = distuv.StudentsT{Sigma: 1, Nu: math.Floor(l.freedom)}.Quantile(p)
	}
	l.expanded = l.factor * l.uncertainty
}

// A Validation tells whether a linear result agrees with a propagation of distributions (JCGM 101:2008, 8.1).
type Validation[S any] struct {
	LowDifference  S    `json:"lowDifference"`  // between the lower ends of the coverage intervals
	HighDifference S    `json:"highDifference"` // between the upper ends
	Tolerance      S    `json:"tolerance"`      // numerical tolerance of the digits of the study, from the linear standard uncertainty
	Valid          bool `json:"valid"`          // neither difference is above the tolerance
	Certain        bool `json:"certain"`        // the Monte Carlo errors of both ends are within a fifth of it (8.2): Valid can be relied on
}

// Validate compares the interval of a linear result with the probabilistically symmetric one of a propagation of
// distributions through the same model. It returns an [*units.ArgumentError] if the two are of different
// coverage or one of them is empty. For a sampling that is certain enough to judge, take one digit more for it than for
// the linear result.
func Validate[Q Point[Q, S], S Difference[S]](l Linear[Q, S], r Result[Q, S]) (v Validation[S], err error) {
	one := unit[S]()
	if l.Coverage != r.Coverage || l.digits == 0 || r.Cases == 0 || one.SI() != 1 {
		return v, &units.ArgumentError{Field: "coverage probability", Value: l.Coverage, Accepted: "two results of one study, not empty, and of the same coverage"}
	}
	low := math.Abs(l.Low.SI() - r.Low.SI())
	high := math.Abs(l.High.SI() - r.High.SI())
	tolerance := 0.5 * lastPlace(l.StandardUncertainty.SI(), l.digits)
	return Validation[S]{
		one.Scale(low), one.Scale(high), one.Scale(tolerance), max(low, high) <= tolerance,
		max(r.Errors.Low.SI(), r.Errors.High.SI()) <= tolerance/5,
	}, nil
}
