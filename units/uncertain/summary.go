package uncertain

import (
	"cmp"
	"math"
	"slices"
	"strconv"

	"gonum.org/v1/gonum/stat"
	"gonum.org/v1/gonum/stat/distuv"

	"example.com/coolward/units"
)

// ends are the ends of the coverage intervals, and the median.
type ends struct{ low, median, high, shortestLow, shortestHigh float64 }

// between returns for m ascending numbers how many places lie from one end of a coverage interval to
// the other, and where the probabilistically symmetric one begins (JCGM 101:2008, 7.7.2).
func between(m int, coverage float64) (q, r int) {
	q = min(int(coverage*float64(m)+0.5), m-1)
	if (m-q)%2 == 0 {
		return q, max((m-q)/2, 1)
	}
	return q, max((m-q+1)/2, 1)
}

// endsOf finds the ends in ascending numbers (JCGM 101:2008, 7.7).
func endsOf(y []float64, coverage float64) ends {
	m := len(y)
	if m == 0 {
		return ends{}
	}
	q, _ := between(m, coverage)
	return endsOfTails(y[:m-q], y[q:], (y[(m-1)/2]+y[m/2])/2, m, coverage)
}

// endsOfTails finds the ends in the m − q least and the m − q largest of m ascending numbers; the ends of every
// interval of that coverage lie there.
func endsOfTails(least, largest []float64, median float64, m int, coverage float64) ends {
	_, r := between(m, coverage)
	e := ends{low: least[r-1], high: largest[r-1], median: median}
	best := 0
	for i := range least { // the shortest one, 7.7.4
		if largest[i]-least[i] < largest[best]-least[best] {
			best = i
		}
	}
	e.shortestLow, e.shortestHigh = least[best], largest[best]
	return e
}

// pooledEnds finds the ends in all numbers of ascending lists, if these are few without sorting all of them.
func pooledEnds(lists [][]float64, coverage float64) ends {
	m := 0
	for _, y := range lists {
		m += len(y)
	}
	if len(lists) > 32 { // where sorting is quicker
		all := slices.Concat(lists...)
		slices.Sort(all)
		return endsOf(all, coverage)
	}
	q, _ := between(m, coverage)
	least, largest := merge(lists, m-q, false), merge(lists, m-q, true)
	slices.Reverse(largest)
	return endsOfTails(least, largest, (ranked(lists, (m-1)/2)+ranked(lists, m/2))/2, m, coverage)
}

// merge returns the n least of all numbers of ascending lists, ascending, or the n largest of them, descending.
func merge(lists [][]float64, n int, fromTop bool) []float64 {
	heads := slices.Clone(lists)
	out := make([]float64, 0, n)
	for len(out) < n {
		best, which := 0.0, -1
		for i, y := range heads {
			if len(y) == 0 {
				continue
			}
			if fromTop && (which < 0 || y[len(y)-1] > best) {
				best, which = y[len(y)-1], i
			} else if !fromTop && (which < 0 || y[0] < best) {
				best, which = y[0], i
			}
		}
		out = append(out, best)
		if y := heads[which]; fromTop {
			heads[which] = y[:len(y)-1]
		} else {
			heads[which] = y[1:]
		}
	}
	return out
}

// ranked returns the number that has k of all numbers of ascending lists before it. The list that holds it is found
// by search, for the number is one of them.
func ranked(lists [][]float64, k int) float64 {
	for _, y := range lists {
		i, _ := slices.BinarySearchFunc(y, k, func(x float64, k int) int {
			_, upTo := places(lists, x)
			return cmp.Compare(upTo, k+1)
		})
		// y[i] is the first of this list with more than k numbers up to it.
		if i < len(y) {
			if before, _ := places(lists, y[i]); before <= k {
				return y[i]
			}
		}
	}
	return 0
}

// places counts the numbers of ascending lists that are below x, and those that are not above it.
func places(lists [][]float64, x float64) (below, upTo int) {
	for _, y := range lists {
		i, found := slices.BinarySearch(y, x)
		below += i
		for found && i < len(y) && y[i] == x {
			i++
		}
		upTo += i
	}
	return below, upTo
}

// A summary is what all blocks together say, in SI numbers, with the Monte Carlo errors.
type summary struct {
	moments
	ends
	errors      struct{ mean, deviation, low, median, high, shortest float64 }
	cases       int
	answered    int
	missing     missing
	tolerance   float64
	converged   bool
	evaluations int
	shares      []shareOf
	halved      []halvedTo
}

type shareOf struct{ first, firstError, total, totalError float64 }

type halvedTo struct{ deviation, error float64 }

func summarise(c settings, blocks []*block) (*summary, error) {
	s := &summary{cases: len(blocks) * c.block}
	answers := make([][]float64, len(blocks))
	used := make([]*block, 0, len(blocks))
	for i, b := range blocks {
		s.missing.merge(&b.missing)
		answers[i] = b.answers
		s.answered += len(b.answers)
		if len(b.answers) > 1 {
			used = append(used, b)
		}
	}
	if needed := int(math.Ceil(4 / (1 - c.coverage))); s.answered < needed || len(used) < 2 {
		return nil, &NoAnswerError{s.cases, s.answered, needed, s.missing.list()}
	}
	s.pool(used)
	s.ends = pooledEnds(answers, c.coverage)
	s.findErrors(used)
	if !(max(s.deviation, s.errors.mean, s.errors.deviation, s.errors.low, s.errors.median, s.errors.high, s.errors.shortest) <= math.MaxFloat64) || s.deviation == 0 && s.low != s.high {
		return nil, &units.ConvergenceError{
			Method: "propagation of distributions", Reason: "the answers are too large or too small for a variance; take another unit",
		}
	}
	s.findTolerance(c.digits)
	if c.shares {
		s.findShares(c, blocks[:leastBlocks])
	}
	return s, nil
}

// pool combines the means and standard deviations of the blocks. Scaled, so that squares stay in range.
func (s *summary) pool(blocks []*block) {
	n, mean := 0.0, 0.0
	for _, b := range blocks {
		w := float64(len(b.answers))
		n += w
		mean += w / float64(s.answered) * b.moments.mean
	}
	s.mean = mean / (n / float64(s.answered))
	square := 0.0
	for _, b := range blocks {
		w := float64(len(b.answers))
		off := b.moments.mean - s.mean
		square += (w-1)/(n-1)*b.moments.deviation*b.moments.deviation + w/(n-1)*off*off
	}
	s.deviation = math.Sqrt(square)
}

// scatter returns the half-width of the 95 % confidence interval of the mean over n blocks.
func scatter(n int, of func(i int) float64) float64 {
	x := make([]float64, n)
	for i := range x {
		x[i] = of(i)
	}
	t := distuv.StudentsT{Sigma: 1, Nu: float64(n - 1)}.Quantile(0.975)
	return t * stat.StdDev(x, nil) / math.Sqrt(float64(n))
}

// findErrors finds the Monte Carlo errors from the scatter of the blocks. The place of a shortest
// interval becomes certain with the cube root of the number of trials only (J. Kim, D. Pollard,
// Annals of Statistics 18, 1990, from memory), so that its error falls from a block to all of them by
// h^(1/3) instead of h^(1/2).
func (s *summary) findErrors(blocks []*block) {
	n := len(blocks)
	s.errors.mean = scatter(n, func(i int) float64 { return blocks[i].moments.mean })
	s.errors.deviation = scatter(n, func(i int) float64 { return blocks[i].moments.deviation })
	s.errors.low = scatter(n, func(i int) float64 { return blocks[i].ends.low })
	s.errors.median = scatter(n, func(i int) float64 { return blocks[i].ends.median })
	s.errors.high = scatter(n, func(i int) float64 { return blocks[i].ends.high })
	s.errors.shortest = math.Pow(float64(n), 1.0/6) * max(
		scatter(n, func(i int) float64 { return blocks[i].ends.shortestLow }),
		scatter(n, func(i int) float64 { return blocks[i].ends.shortestHigh }))
}

// findTolerance finds the numerical tolerance, and whether the results are certain to it (JCGM
// 101:2008, 7.9.2 and 7.9.4). The errors are with 95 %, so a little more than twice the standard deviation.
func (s *summary) findTolerance(digits int) {
	s.tolerance = 0.5 * lastPlace(s.deviation, digits)
	s.converged = max(s.errors.mean, s.errors.deviation, s.errors.low, s.errors.high) <= s.tolerance
}

// lastPlace returns the value of the last of the given number of significant digits of x, a power of ten.
func lastPlace(x float64, digits int) float64 {
	if x == 0 {
		return 0
	}
	text := strconv.FormatFloat(x, 'e', digits-1, 64)
	for i := range text {
		if text[i] == 'e' {
			exponent, _ := strconv.Atoi(text[i+1:])
			return math.Pow10(exponent - digits + 1)
		}
	}
	return 0
}

// findShares finds Sobol' indices of the groups, and what halving the spread of an input leaves.
//
// With A, B and A with the inputs of the group from B: the first-order index is the mean of
// f(B) (f(AB) − f(A)) over the variance (A. Saltelli et al., Computer Physics Communications 181, 2010,
// Table 2 (b)), or one less the mean of (f(B) − f(AB))²/2 over it (M. J. W. Jansen, Computer Physics
// Communications 117, 1999) where the index is large, each where it scatters less; the total index is the
// mean of (f(A) − f(AB))²/2 over the variance (Jansen). I. M. Sobol', Mathematical Modelling and
// Computational Experiment 1, 1993, has the indices. All from memory.
func (s *summary) findShares(c settings, blocks []*block) {
	used := make([]*block, 0, len(blocks))
	for _, b := range blocks {
		if len(b.answers) > 1 {
			used = append(used, b)
		}
	}
	if len(used) < 2 {
		return
	}
	variance := func(b *block) float64 { return b.moments.deviation * b.moments.deviation }
	for g := range c.groups {
		var share shareOf
		share.total, share.totalError = quotient(used, func(b *block) float64 { return b.effects[g].total }, variance)
		if share.total < 0.5 {
			share.first, share.firstError = quotient(used, func(b *block) float64 { return b.effects[g].first }, variance)
		} else {
			share.first, share.firstError = quotient(used, func(b *block) float64 { return variance(b) - b.effects[g].alternative }, variance)
		}
		s.shares = append(s.shares, share)
	}
	for j := range c.specs {
		ratio, err := quotient(used, func(b *block) float64 { return b.halved[j] }, func(b *block) float64 { return b.paired })
		root := math.Sqrt(ratio)
		h := halvedTo{deviation: s.deviation * root}
		if root > 0 {
			h.error = math.Hypot(s.deviation*err/(2*root), root*s.errors.deviation)
		}
		s.halved = append(s.halved, h)
	}
}

// quotient returns the sum of x over the blocks divided by that of y, with its Monte Carlo error; 0
// where y is 0.
func quotient(blocks []*block, x, y func(*block) float64) (ratio, err float64) {
	var above, below float64
	for _, b := range blocks {
		above += x(b)
		below += y(b)
	}
	if !(below > 0) {
		return 0, 0
	}
	ratio = above / below
	mean := below / float64(len(blocks))
	return ratio, scatter(len(blocks), func(i int) float64 { return (x(blocks[i]) - ratio*y(blocks[i])) / mean })
}
