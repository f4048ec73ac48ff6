package uncertain

import (
	"fmt"
	"math"
	"runtime"
	"sync/atomic"

	"gonum.org/v1/gonum/mat"

	"example.com/coolward/units"
)

// A Study is a list of uncertain inputs with how they are to be propagated. The zero Study has no
// inputs and propagates with the defaults. Declare inputs with [Add] before propagating; a study
// that is not added to may be propagated from many goroutines.
type Study struct {
	Seed     uint64  // of the random numbers; the same seed gives the same digits, on any number of workers
	Coverage float64 // probability of the coverage interval, 0.1 to 0.9999; zero means 0.95
	Digits   int     // significant digits of the standard uncertainty that the sampling is to make certain, 1 to 3; zero means 1
	Trials   int     // most trials that it may take for that, up to 1e8; zero means 102 400
	Workers  int     // zero means one for each processor

	// OmitShares leaves out the shares of the inputs and what halving them brings, which take further
	// evaluations of the model: about three quarters of 10 240 for each input.
	OmitShares bool

	// Progress, if set, is told how many evaluations are done and how many are planned so far. The
	// workers call it, one at a time.
	Progress func(done, planned int)

	specs []*spec
	pairs []pair
	fault error
}

// A spec is one input of a study.
type spec struct {
	marginal
	name   string
	origin Origin
	index  int
}

// An Origin says where the distribution of an input comes from. Make one with [Source], [Assumed] or [Model].
type Origin struct {
	kind string
	text string
}

// Source is an origin that can be cited: a certificate, a drawing, a handbook, a measurement.
func Source(text string) Origin { return Origin{"", text} }

// Assumed marks an input that nobody measured or looked up, with the reason for the assumption.
func Assumed(reason string) Origin { return Origin{"assumed", reason} }

// Model marks an input that stands for the uncertainty of a model itself, such as the scatter of a
// correlation, with its source.
func Model(source string) Origin { return Origin{"model", source} }

// String writes the origin, such as "assumed: as in the neighbouring room".
func (o Origin) String() string {
	if o.kind == "" {
		return o.text
	}
	return o.kind + ": " + o.text
}

// IsAssumed reports whether the origin is [Assumed].
func (o Origin) IsAssumed() bool { return o.kind == "assumed" }

// IsModel reports whether the origin is [Model].
func (o Origin) IsModel() bool { return o.kind == "model" }

// MarshalText writes the origin as String does.
func (o Origin) MarshalText() ([]byte, error) { return []byte(o.String()), nil }

// An Input is the handle of an input of a study: [Input.In] gives its value in a draw.
type Input[Q any] struct {
	spec *spec
	of   func(si float64) Q
}

// Handle is an [Input] of any kind.
type Handle interface{ handle() *spec }

func (in Input[Q]) handle() *spec { return in.spec }

// Add declares an input. What is wrong with it is reported when the study is propagated.
func Add[Q any](s *Study, name string, d Distribution[Q], origin Origin) Input[Q] {
	in := &spec{marginal: d.marginal, name: name, origin: origin, index: len(s.specs)}
	switch {
	case name == "":
		in.refuse("name", nil, "a name")
	case origin.text == "":
		in.refuse("origin", nil, "uncertain.Source, uncertain.Assumed or uncertain.Model with a text")
	case d.quantile == nil:
		in.refuse("distribution", nil, "a distribution, such as uncertain.PlusMinus(…).Rectangular()")
	case !(math.Abs(in.estimate) <= math.MaxFloat64 && in.uncertainty <= math.MaxFloat64):
		in.refuse("distribution", in.text, "a distribution whose mean and standard deviation are finite")
	}
	for _, other := range s.specs {
		if other.name == name {
			in.refuse("name", name, "a name that no other input has")
		}
	}
	if in.fault != nil {
		fault := *in.fault
		fault.Field = fmt.Sprintf("input %q: %s", name, fault.Field)
		s.refuse(&fault)
	}
	s.specs = append(s.specs, in)
	return Input[Q]{in, d.of}
}

// refuse keeps the first fault.
func (s *Study) refuse(fault error) {
	if s.fault == nil {
		s.fault = fault
	}
}

// A Draw is one set of values of all inputs. It is valid during the call of the model that it is
// handed to.
type Draw struct {
	row   []float64
	specs []*spec
	fault *atomic.Pointer[units.ArgumentError]
}

// In returns the value of the input in a draw. A draw of another study has none: In returns NaN or zero, and
// the propagation ends with an [*units.ArgumentError].
func (in Input[Q]) In(x Draw) Q {
	if in.spec != nil && in.spec.index < len(x.row) && x.specs[in.spec.index] == in.spec && in.of != nil {
		return in.of(x.row[in.spec.index])
	}
	return in.foreign(x)
}

func (in Input[Q]) foreign(x Draw) (none Q) {
	fault := &units.ArgumentError{Field: "input", Accepted: "an input that was added to the study that is propagated"}
	if in.spec != nil {
		fault.Value = in.spec.name
	}
	if x.fault != nil {
		x.fault.CompareAndSwap(nil, fault)
	}
	if in.of != nil {
		return in.of(math.NaN())
	}
	return none
}

// settings are the fields of a study with the defaults filled in.
type settings struct {
	specs    []*spec
	groups   []group
	product  *mat.SymDense // product-moment correlation coefficients of the inputs
	coverage float64
	digits   int
	block    int // trials in a block
	blocks   int // most blocks
	workers  int
	seed     uint64
	shares   bool
	progress func(done, planned int)
}

// leastBlocks are needed for the standard deviation of their results.
const leastBlocks = 10

// check returns the settings, or the first fault.
func (s *Study) check() (settings, error) {
	if s == nil {
		return settings{}, &units.ArgumentError{Field: "study", Accepted: "a study"}
	}
	c := settings{
		coverage: orDefault(s.Coverage, 0.95), digits: orDefault(s.Digits, 1), workers: orDefault(s.Workers, runtime.GOMAXPROCS(0)),
		seed: s.Seed, shares: !s.OmitShares, progress: s.Progress, specs: s.specs,
	}
	trials := orDefault(s.Trials, 102400)
	for _, err := range []error{
		s.fault,
		units.CheckNumber("coverage probability", c.coverage, 0.1, 0.9999),
		units.CheckNumber("digits", float64(c.digits), 1, 3),
		units.CheckNumber("workers", float64(c.workers), 1, 1<<20),
	} {
		if err != nil {
			return c, err
		}
	}
	if len(s.specs) == 0 {
		return c, &units.ArgumentError{Field: "study", Accepted: "a study with an input; declare them with uncertain.Add"}
	}
	// In each tail of a block there are two trials at least, and ten where there is room. Halves
	// and quarters of a block are needed for the shares.
	least := 4 * int(math.Ceil(1/(1-c.coverage)))
	c.block = min(max(1024, 5*least), trials/leastBlocks) &^ 3
	if err := units.CheckNumber("trials", float64(trials), float64(leastBlocks*max(least, 80)), 1e8); err != nil {
		return c, err
	}
	c.blocks = trials / c.block
	var err error
	c.groups, c.product, err = s.groups()
	return c, err
}

func orDefault[T int | float64](x, standard T) T {
	if x == 0 {
		return standard
	}
	return x
}
