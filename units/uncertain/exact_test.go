package uncertain_test

import (
	"math"
	"testing"

	"github.com/stretchr/testify/require"
	"gonum.org/v1/gonum/stat/distuv"

	"example.com/coolward/units/uncertain"
)

// An exactCase is a model whose distribution is known in closed form.
type exactCase struct {
	name         string
	build        func(s *uncertain.Study) func(uncertain.Draw) float64
	mean, u      float64
	quantile     func(p float64) float64
	first, total []float64 // Sobol' indices of the groups
	halved       []float64 // standard uncertainty with half the spread of each input
	linear       bool      // linearisation is exact
}

func exactCases() []exactCase {
	// 2a − 3b + c + d with u 1, 2, 2, 1 and r(a, b) = 0.5: variances of the groups 4 + 36 − 12, 4 and 1.
	sum := exactCase{
		name: "linear, normal",
		build: func(s *uncertain.Study) func(uncertain.Draw) float64 {
			a, b, c, d := normal(s, "a", 1, 1), normal(s, "b", 2, 2), normal(s, "c", 3, 2), normal(s, "d", 4, 1)
			s.Correlate(a, b, 0.5)
			return func(x uncertain.Draw) float64 { return float64(2*a.In(x) - 3*b.In(x) + c.In(x) + d.In(x)) }
		},
		mean: 3, u: math.Sqrt(33),
		quantile: distuv.Normal{Mu: 3, Sigma: math.Sqrt(33)}.Quantile,
		first:    []float64{28.0 / 33, 4.0 / 33, 1.0 / 33}, total: []float64{28.0 / 33, 4.0 / 33, 1.0 / 33},
		halved: []float64{math.Sqrt(1 + 36 - 6 + 5), math.Sqrt(4 + 9 - 6 + 5), math.Sqrt(33 - 3), math.Sqrt(33 - 0.75)},
		linear: true,
	}
	// The product of log-normals with sigma 0.1 and 0.3 and median 1 is log-normal. With v = exp(sigma²) − 1 the variance of the
	// product over its squared mean is (1+v1)(1+v2) − 1, the first-order parts v1 and v2, and the total ones v1 (1+v2) and v2 (1+v1).
	v1, v2 := math.Expm1(0.01), math.Expm1(0.09)
	relative := (1+v1)*(1+v2) - 1
	mean := math.Exp(0.05)
	half := func(v, other float64) float64 { return mean * math.Sqrt((1+v/4)*(1+other)-1) }
	product := exactCase{
		name: "product of log-normals",
		build: func(s *uncertain.Study) func(uncertain.Draw) float64 {
			k := distuv.UnitNormal.Quantile(0.975)
			a := uncertain.Add(s, "a", uncertain.WithinFactor(number(1), math.Exp(0.1*k)).LogNormal(0.95), example)
			b := uncertain.Add(s, "b", uncertain.WithinFactor(number(1), math.Exp(0.3*k)).LogNormal(0.95), example)
			return func(x uncertain.Draw) float64 { return float64(a.In(x) * b.In(x)) }
		},
		mean: mean, u: mean * math.Sqrt(relative),
		quantile: distuv.LogNormal{Mu: 0, Sigma: math.Sqrt(0.1)}.Quantile,
		first:    []float64{v1 / relative, v2 / relative}, total: []float64{v1 * (1 + v2) / relative, v2 * (1 + v1) / relative},
		halved: []float64{half(v1, v2), half(v2, v1)},
	}
	// The minimum y of two rectangular ones on 0 to 1 has the distribution function 1 − (1−y)². E(y|x) = x − x²/2.
	minimum := exactCase{
		name: "minimum of two",
		build: func(s *uncertain.Study) func(uncertain.Draw) float64 {
			a, b := rectangular(s, "a", 0, 1), rectangular(s, "b", 0, 1)
			return func(x uncertain.Draw) float64 { return float64(min(a.In(x), b.In(x))) }
		},
		mean: 1.0 / 3, u: math.Sqrt(1.0 / 18),
		quantile: func(p float64) float64 { return 1 - math.Sqrt(1-p) },
		first:    []float64{0.4, 0.4}, total: []float64{0.6, 0.6},
	}
	return []exactCase{sum, product, minimum}
}

func TestExact(t *testing.T) {
	for _, c := range exactCases() {
		t.Run(c.name, func(t *testing.T) {
			s := uncertain.Study{Seed: 5}
			model := c.build(&s)
			r, err := uncertain.Propagate(t.Context(), &s, func(x uncertain.Draw) (number, error) { return number(model(x)), nil })
			require.NoError(t, err)
			require.True(t, r.Converged)
			require.Equal(t, r.Cases, r.Answered)
			within(t, "mean", r.Mean, r.Errors.Mean, c.mean)
			within(t, "standard uncertainty", r.StandardUncertainty, r.Errors.StandardUncertainty, c.u)
			within(t, "low", r.Low, r.Errors.Low, c.quantile(0.025))
			within(t, "median", r.Likely, r.Errors.Likely, c.quantile(0.5))
			within(t, "high", r.High, r.Errors.High, c.quantile(0.975))
			require.Len(t, r.Shares, len(c.first))
			for i, share := range r.Shares {
				within(t, "first-order share", number(share.First), number(share.FirstError), c.first[i])
				within(t, "total share", number(share.Total), number(share.TotalError), c.total[i])
				require.Less(t, share.FirstError, 0.05)
			}
			for i, want := range c.halved {
				within(t, "halved "+r.Halvings[i].Input, r.Halvings[i].StandardUncertainty, r.Halvings[i].Error, want)
			}
			if c.linear {
				l := linearise(t, &s, model)
				prints(t, "linear estimate", float64(l.Estimate), c.mean, 1e-12)
				prints(t, "linear standard uncertainty", float64(l.StandardUncertainty), c.u, 1e-12)
				prints(t, "linear end", float64(l.High), c.quantile(0.975), 1e-12)
				v, err := uncertain.Validate(l, r)
				require.NoError(t, err)
				require.True(t, v.Valid)
			}
		})
	}
}

// The Monte Carlo errors that a result states hold for 95 % of the seeds.
func TestStatedErrors(t *testing.T) {
	const seeds = 1000
	for _, c := range exactCases() {
		t.Run(c.name, func(t *testing.T) {
			s := uncertain.Study{OmitShares: true, Trials: 1760}
			model := c.build(&s)
			var held [5]int
			low, median, high := c.quantile(0.025), c.quantile(0.5), c.quantile(0.975)
			for seed := range seeds {
				s.Seed = uint64(seed)
				r, err := uncertain.Propagate(t.Context(), &s, func(x uncertain.Draw) (number, error) { return number(model(x)), nil })
				require.NoError(t, err)
				for i, x := range [][3]float64{
					{float64(r.Mean), float64(r.Errors.Mean), c.mean},
					{float64(r.StandardUncertainty), float64(r.Errors.StandardUncertainty), c.u},
					{float64(r.Low), float64(r.Errors.Low), low},
					{float64(r.Likely), float64(r.Errors.Likely), median},
					{float64(r.High), float64(r.Errors.High), high},
				} {
					if math.Abs(x[0]-x[2]) <= x[1] {
						held[i]++
					}
				}
			}
			for i, what := range []string{"mean", "standard uncertainty", "low", "median", "high"} {
				if portion := float64(held[i]) / seeds; portion < 0.93 || portion > 0.97 {
					t.Errorf("%s: the stated error held for %.1f %% of %d seeds, want 93 to 97 %%", what, 100*portion, seeds)
				}
			}
		})
	}
}
