package uncertain

import (
	"slices"
)

// A Result is what is known of an answer. Every number is whole; the texts have only the digits that are
// known.
type Result[Q, S any] struct {
	Low    Q `json:"low"`    // lower end of the probabilistically symmetric coverage interval
	Likely Q `json:"likely"` // median
	High   Q `json:"high"`   // upper end

	ShortestLow  Q `json:"shortestLow"` // lower end of the shortest coverage interval
	ShortestHigh Q `json:"shortestHigh"`

	Mean                Q `json:"mean"`
	StandardUncertainty S `json:"standardUncertainty"` // standard deviation of the answers

	Errors Errors[S] `json:"monteCarloErrors"` // of the above

	Coverage  float64 `json:"coverage"`  // probability of the intervals
	Tolerance S       `json:"tolerance"` // numerical tolerance of the digits wanted (JCGM 101:2008, 7.9.2)
	Converged bool    `json:"converged"` // whether mean, standard uncertainty, Low and High are certain to it

	Cases    int       `json:"cases"`             // trials for the distribution
	Answered int       `json:"answered"`          // how many of them have an answer; the rest of the result is about them
	Missing  []Missing `json:"missing,omitempty"` // the others by kind

	Shares   []Share      `json:"shares,omitempty"`   // of the spread, for each independent input or group, in the order of the study
	Halvings []Halving[S] `json:"halvings,omitempty"` // for each input, in the order of the study

	Inputs      []Stated `json:"inputs"`
	Evaluations int      `json:"evaluations"` // of the model
	Seed        uint64   `json:"seed"`
}

// Errors are the Monte Carlo errors: with 95 % probability, a number lies within ± its error of what infinitely
// many trials would give. They come from the scatter between the blocks of trials.
type Errors[S any] struct {
	Low                 S `json:"low"`
	Likely              S `json:"likely"`
	High                S `json:"high"`
	Shortest            S `json:"shortest"` // of either end of the shortest interval; an upper estimate
	Mean                S `json:"mean"`
	StandardUncertainty S `json:"standardUncertainty"`
}

// A Share is how much of the variance of the answer comes from an input. Correlated inputs share theirs,
// so they are one group. The indices are those of Sobol'. Estimated numbers may lie below 0 or above 1
// by their error.
type Share struct {
	Inputs     []string `json:"inputs"` // one name, or the names of correlated inputs
	First      float64  `json:"first"`  // first order: what would vanish if the input were known exactly
	FirstError float64  `json:"firstError"`
	Total      float64  `json:"total"` // with all its interactions: what would stay if all others were known exactly
	TotalError float64  `json:"totalError"`
}

// A Halving is what measuring an input better would bring: the standard uncertainty of the answer if each value
// of the input lay half as far from its mean.
type Halving[S any] struct {
	Input               string `json:"input"`
	StandardUncertainty S      `json:"standardUncertainty"`
	Error               S      `json:"error"` // Monte Carlo error
}

// A Stated is an input as it was stated.
type Stated struct {
	Name         string `json:"name"`
	Distribution string `json:"distribution"`
	Origin       Origin `json:"origin"`
}

func newResult[Q, S any](c settings, s *summary, point func(float64) Q, difference func(float64) S) Result[Q, S] {
	r := Result[Q, S]{
		Low: point(s.low), Likely: point(s.median), High: point(s.high),
		ShortestLow: point(s.shortestLow), ShortestHigh: point(s.shortestHigh),
		Mean: point(s.mean), StandardUncertainty: difference(s.deviation),
		Errors: Errors[S]{
			Low: difference(s.errors.low), Likely: difference(s.errors.median), High: difference(s.errors.high),
			Shortest: difference(s.errors.shortest),
			Mean:     difference(s.errors.mean), StandardUncertainty: difference(s.errors.deviation),
		},
		Coverage: c.coverage, Tolerance: difference(s.tolerance), Converged: s.converged,
		Cases: s.cases, Answered: s.answered, Missing: s.missing.list(),
		Evaluations: s.evaluations, Seed: c.seed,
	}
	for g, share := range s.shares {
		names := make([]string, 0, len(c.groups[g].inputs))
		for _, j := range c.groups[g].inputs {
			names = append(names, c.specs[j].name)
		}
		r.Shares = append(r.Shares, Share{names, share.first, share.firstError, share.total, share.totalError})
	}
	for j, h := range s.halved {
		r.Halvings = append(r.Halvings, Halving[S]{c.specs[j].name, difference(h.deviation), difference(h.error)})
	}
	r.Inputs = stated(c.specs)
	return r
}

func stated(specs []*spec) []Stated {
	all := make([]Stated, 0, len(specs))
	for _, in := range specs {
		all = append(all, Stated{in.name, in.text, in.origin})
	}
	return slices.Clip(all)
}
