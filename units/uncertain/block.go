package uncertain

import (
	"errors"
	"math"
	"math/bits"
	"math/rand/v2"
	"slices"

	"gonum.org/v1/gonum/mat"
	"gonum.org/v1/gonum/stat"
	"gonum.org/v1/gonum/stat/distuv"
)

// A block is an independent set of trials: two Latin hypercubes A and B (M. D. McKay, R. J. Beckman,
// W. J. Conover, Technometrics 21, 1979), each of half its size. What blocks differ by shows the Monte
// Carlo error.
type block struct {
	answers []float64 // of A and B that exist, ascending
	missing missing
	moments moments
	ends    ends
	effects []effect // of each group; empty where they are not wanted
	halved  []float64
	paired  float64 // variance of the cases that halved is compared with
}

// moments are the mean and the standard deviation of the answers.
type moments struct{ mean, deviation float64 }

// An effect holds what the shares of a group are computed from.
type effect struct{ first, alternative, total float64 }

// A sampler evaluates blocks, one after the other. Each worker has its own.
type sampler struct {
	settings
	model func(row []float64) (float64, error)
	done  <-chan struct{}
	count func(evaluations int)

	hypercube *mat.Dense
	normals   []float64
	row       []float64
	y         []float64 // of A and B in the order of their rows, NaN where there is none
	pending   int
}

// counted is how many evaluations pass between two calls of count.
const counted = 64

// errStopped ends the sampling.
var errStopped = errors.New("stopped")

func newSampler(c settings, model func([]float64) (float64, error), done <-chan struct{}, count func(int)) *sampler {
	n := len(c.specs)
	return &sampler{
		settings: c, model: model, done: done, count: count,
		hypercube: mat.NewDense(c.block, n, nil), normals: make([]float64, n), row: make([]float64, n), y: make([]float64, c.block),
	}
}

// evaluations returns how many evaluations a block takes.
func (c *settings) evaluations(effects bool) int {
	if !effects {
		return c.block
	}
	return c.block + c.block/2*len(c.groups) + c.block/4*len(c.specs)
}

// run evaluates the block of the given index.
func (s *sampler) run(index int, effects bool) (*block, error) {
	s.draw(index)
	b := &block{answers: make([]float64, 0, s.block)}
	for i := range s.y {
		y, err := s.evaluate(s.hypercube.RawRowView(i))
		s.y[i] = y
		switch err {
		case nil:
			b.answers = append(b.answers, y)
		case errStopped:
			return nil, err
		default:
			b.missing.add(err)
		}
	}
	if effects {
		if err := s.effects(b); err != nil {
			return nil, err
		}
	}
	s.count(s.pending)
	s.pending = 0
	if len(b.answers) > 1 {
		b.moments.mean, b.moments.deviation = stat.MeanStdDev(b.answers, nil)
	}
	slices.Sort(b.answers)
	b.ends = endsOf(b.answers, s.coverage)
	return b, nil
}

func (s *sampler) evaluate(row []float64) (float64, error) {
	select {
	case <-s.done:
		return math.NaN(), errStopped
	default:
	}
	if s.pending++; s.pending == counted {
		s.count(s.pending)
		s.pending = 0
	}
	return s.model(row)
}

// draw fills the rows of the hypercube with values of the inputs.
func (s *sampler) draw(index int) {
	n := len(s.specs)
	cells := s.hypercube.RawMatrix().Data
	middle := s.block / 2 * n
	source := rand.NewPCG(s.seed, uint64(index))
	hypercube(cells[:middle], n, source)
	hypercube(cells[middle:], n, source)
	for i := range s.block {
		row := s.hypercube.RawRowView(i)
		for g := range s.groups {
			s.groups[g].transform(row, s.specs, s.normals)
		}
	}
}

// hypercube fills the rows of n cells with a Latin hypercube: in each column, each stratum once. The strata are shuffled as
// they are dealt (R. Durstenfeld, Communications of the ACM 7, 1964, from memory); what is left of the random number
// places the value in its stratum. A random shift of all strata of a column, with the ends joined (R. Cranley, T. N. L. Patterson,
// SIAM Journal on Numerical Analysis 13, 1976, from memory), keeps a quantile from always falling on the same part
// of a stratum, which would make the scatter between hypercubes a bad measure of the error. It takes a third of the
// time of gonum's hypercube, which draws twice for a value.
func hypercube(cells []float64, n int, source *rand.PCG) {
	rows := len(cells) / n
	for column := range n {
		shift := float64(source.Uint64()>>11) * 0x1p-53
		for j := range rows {
			place, rest := bits.Mul64(source.Uint64(), uint64(j+1))
			at := int(place)*n + column
			u := (float64(j)+float64(rest>>11)*0x1p-53)/float64(rows) + shift
			if u >= 1 {
				u--
			}
			cells[j*n+column] = cells[at]
			cells[at] = u
		}
	}
}

// transform turns uniform numbers into values of the inputs of the group.
func (g *group) transform(row []float64, specs []*spec, normals []float64) {
	if g.factor == nil {
		i := g.inputs[0]
		row[i] = specs[i].quantile(probability(row[i]))
		return
	}
	for j, i := range g.inputs {
		normals[j] = distuv.UnitNormal.Quantile(probability(row[i]))
	}
	for j, i := range g.inputs {
		z := 0.0
		for k, c := range g.factor.RawRowView(j) {
			z += c * normals[k]
		}
		row[i] = specs[i].at(z)
	}
}

// effects evaluates what the shares and the halvings are computed from.
func (s *sampler) effects(b *block) error {
	half, quarter := s.block/2, s.block/4
	mean := stat.Mean(b.answers, nil)
	a := func(i int) []float64 { return s.hypercube.RawRowView(i) }
	for g := range s.groups {
		// The rows of A with the inputs of the group taken from B.
		sums, n := effect{}, 0
		for i := range half {
			copy(s.row, a(i))
			for _, j := range s.groups[g].inputs {
				s.row[j] = a(half + i)[j]
			}
			y, err := s.evaluate(s.row)
			if err == errStopped {
				return err
			}
			ya, yb := s.y[i], s.y[half+i]
			if err != nil || math.IsNaN(ya) || math.IsNaN(yb) {
				continue
			}
			n++
			sums.first += (yb - mean) * (y - ya)
			sums.alternative += (yb - y) * (yb - y) / 2
			sums.total += (ya - y) * (ya - y) / 2
		}
		scale := 1 / float64(max(n, 1))
		b.effects = append(b.effects, effect{scale * sums.first, scale * sums.alternative, scale * sums.total})
	}
	same := make([]float64, 0, quarter)
	for _, y := range s.y[:quarter] {
		if !math.IsNaN(y) {
			same = append(same, y)
		}
	}
	b.paired = variance(same)
	for j, in := range s.specs {
		same = same[:0]
		for i := range quarter {
			copy(s.row, a(i))
			s.row[j] = (s.row[j] + in.estimate) / 2
			switch y, err := s.evaluate(s.row); err {
			case nil:
				same = append(same, y)
			case errStopped:
				return err
			}
		}
		b.halved = append(b.halved, variance(same))
	}
	return nil
}

func variance(x []float64) float64 {
	if len(x) < 2 {
		return 0
	}
	return stat.Variance(x, nil)
}
