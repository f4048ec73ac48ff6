package uncertain

import (
	"fmt"
	"math"
	"strings"

	"gonum.org/v1/gonum/mat"
	"gonum.org/v1/gonum/stat/distuv"

	"example.com/coolward/units"
)

// A pair is a correlation that was stated.
type pair struct {
	a, b  *spec
	r     float64
	ranks bool
}

// Correlate states the product-moment correlation coefficient r of two inputs, that of GUM 5.2.2. It is reached with a Gaussian copula:
// two normal variables with the coefficient that gives r between the inputs are turned into their
// distributions (A. Nataf, Comptes rendus de l'Académie des sciences 225, 1962, from memory). For
// two normal inputs it is r itself. Pairs that are not stated are uncorrelated.
//
// What is wrong with it is reported when the study is propagated: an input of another study, a pair stated
// twice, a coefficient that the two distributions cannot have, or coefficients that do not fit
// together, whose matrix is not positive semidefinite.
func (s *Study) Correlate(a, b Handle, r float64) { s.correlate(a, b, r, false) }

// CorrelateRanks states Spearman's rank correlation coefficient of two inputs, which does not depend on their distributions.
// The coefficient of the normal variables of the Gaussian copula is then 2 sin(π rho/6)
// (K. Pearson, Drapers' Company Research Memoirs, Biometric Series IV, 1907, from memory). The rest is as for [Study.Correlate].
func (s *Study) CorrelateRanks(a, b Handle, rho float64) { s.correlate(a, b, rho, true) }

func (s *Study) correlate(a, b Handle, r float64, ranks bool) {
	p := pair{r: r, ranks: ranks}
	for i, h := range []Handle{a, b} {
		in := (*spec)(nil)
		if h != nil {
			in = h.handle()
		}
		if in == nil || in.index >= len(s.specs) || s.specs[in.index] != in {
			s.refuse(&units.ArgumentError{Field: "correlated input", Accepted: "an input that was added to this study"})
			return
		}
		if i == 0 {
			p.a = in
		} else {
			p.b = in
		}
	}
	field := fmt.Sprintf("correlation of %q and %q", p.a.name, p.b.name)
	if p.a == p.b {
		s.refuse(&units.ArgumentError{Field: field, Value: r, Accepted: "two different inputs"})
	}
	if err := units.CheckNumber(field, r, -1, 1); err != nil {
		s.refuse(err)
	}
	for _, q := range s.pairs {
		if q.a == p.a && q.b == p.b || q.a == p.b && q.b == p.a {
			s.refuse(&units.ArgumentError{Field: field, Value: r, Accepted: "one statement for a pair"})
		}
	}
	s.pairs = append(s.pairs, p)
}

// A group is a set of inputs that are independent of all others.
type group struct {
	inputs []int
	factor *mat.Dense // times independent standard normals gives the correlated ones; nil for a single input
}

// groups returns the independent groups in the order of their first inputs, and the product-moment
// correlation coefficients of all inputs.
func (s *Study) groups() ([]group, *mat.SymDense, error) {
	n := len(s.specs)
	product, normal := identity(n), identity(n)
	first := make([]int, n) // the first input of the group of each
	for i := range first {
		first[i] = i
	}
	expansions := map[*spec]*expansion{}
	for _, p := range s.pairs {
		r, z, err := coefficients(p, expansions)
		if err != nil {
			return nil, nil, err
		}
		product.SetSym(p.a.index, p.b.index, r)
		normal.SetSym(p.a.index, p.b.index, z)
		from, to := first[p.a.index], first[p.b.index]
		from, to = max(from, to), min(from, to)
		for i := range first {
			if first[i] == from {
				first[i] = to
			}
		}
	}
	var all []group
	for i := range n {
		if first[i] != i {
			continue
		}
		g := group{}
		for j := i; j < n; j++ {
			if first[j] == i {
				g.inputs = append(g.inputs, j)
			}
		}
		if err := g.factorise(s, normal); err != nil {
			return nil, nil, err
		}
		all = append(all, g)
	}
	return all, product, nil
}

func identity(n int) *mat.SymDense {
	m := mat.NewSymDense(n, nil)
	for i := range n {
		m.SetSym(i, i, 1)
	}
	return m
}

// factorise finds the factor of a group, from the Cholesky decomposition with pivoting, as the matrix may
// be singular.
func (g *group) factorise(s *Study, normal *mat.SymDense) error {
	n := len(g.inputs)
	if n == 1 {
		return nil
	}
	r := mat.NewSymDense(n, nil)
	names := make([]string, n)
	for i, a := range g.inputs {
		names[i] = fmt.Sprintf("%q", s.specs[a].name)
		for j, b := range g.inputs[:i+1] {
			r.SetSym(i, j, normal.At(a, b))
		}
	}
	var eigen mat.EigenSym
	least := math.Inf(-1)
	if eigen.Factorize(r, false) {
		least = eigen.Values(nil)[0]
	}
	const rounding = 1e-9
	if least < -rounding {
		return &units.ArgumentError{
			Field:    "correlations of " + strings.Join(names, ", "),
			Value:    fmt.Sprintf("a matrix with the eigenvalue %.3g", least),
			Accepted: "a positive semidefinite matrix; the coefficients do not fit together",
		}
	}
	var cholesky mat.PivotedCholesky
	cholesky.Factorize(r, rounding)
	var upper mat.TriDense
	cholesky.UTo(&upper)
	g.factor = mat.NewDense(n, n, nil)
	for k, row := range cholesky.ColumnPivots(nil) {
		for j := range k + 1 {
			g.factor.Set(row, j, upper.At(j, k))
		}
	}
	return nil
}

// coefficients returns the product-moment coefficient of a pair, and that of its normal variables.
func coefficients(p pair, expansions map[*spec]*expansion) (product, normal float64, err error) {
	if p.a.gaussian && p.b.gaussian {
		if p.ranks {
			z := 2 * math.Sin(math.Pi*p.r/6)
			return z, z, nil
		}
		return p.r, p.r, nil
	}
	for _, in := range []*spec{p.a, p.b} {
		if expansions[in] == nil {
			expansions[in] = expand(in.law)
		}
	}
	a, b := expansions[p.a], expansions[p.b]
	if p.ranks {
		z := 2 * math.Sin(math.Pi*p.r/6)
		return a.product(b, z), z, nil
	}
	low, high := -1.0, 1.0
	from, to := a.product(b, low), a.product(b, high)
	const digits = 1e-6 // of the expansion
	if p.r < from-digits || p.r > to+digits {
		return 0, 0, &units.ArgumentError{
			Field:    fmt.Sprintf("correlation of %q and %q", p.a.name, p.b.name),
			Value:    p.r,
			Accepted: fmt.Sprintf("%.4f to %.4f, which their distributions can have; or a rank correlation", from, to),
		}
	}
	for range 60 {
		middle := (low + high) / 2
		if a.product(b, middle) < p.r {
			low = middle
		} else {
			high = middle
		}
	}
	return p.r, (low + high) / 2, nil
}

// An expansion holds the coefficients of a standardised law in the normalised Hermite polynomials of the
// standard normal from which it comes, from the first on; the last one holds the remainder.
type expansion []float64

const hermiteTerms = 32 // even, so that the remainder of an odd law is odd

// expand integrates over the standard normal with the trapezoidal rule, which converges faster than any power there.
func expand(l law) *expansion {
	const step = 1.0 / 64
	c := make(expansion, hermiteTerms+1)
	var mean, square float64
	for i := -529; i <= 529; i++ {
		z := float64(i) * step
		w := step * distuv.UnitNormal.Prob(z)
		y := w * l.at(z)
		mean += y
		square += y * l.at(z)
		before, h := 0.0, 1.0
		for k := range hermiteTerms {
			// sqrt(k+1) h(k+1) = z h(k) − sqrt(k) h(k−1)
			before, h = h, (z*h-math.Sqrt(float64(k))*before)/math.Sqrt(float64(k+1))
			c[k] += y * h
		}
	}
	variance := square - mean*mean
	rest := variance
	for _, x := range c[:hermiteTerms] {
		rest -= x * x
	}
	c[hermiteTerms] = math.Sqrt(max(rest, 0))
	for k := range c {
		c[k] /= math.Sqrt(max(variance, math.SmallestNonzeroFloat64))
	}
	return &c
}

// product returns the product-moment correlation coefficient of two laws whose normal variables have the
// coefficient r, by the formula of F. G. Mehler (Journal für die reine und angewandte Mathematik 66, 1866, from memory).
func (c *expansion) product(d *expansion, r float64) float64 {
	sum, power := 0.0, 1.0
	for k := range *c {
		power *= r
		sum += (*c)[k] * (*d)[k] * power
	}
	return sum
}
