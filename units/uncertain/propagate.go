package uncertain

import (
	"context"
	"fmt"
	"runtime/debug"
	"sync"
	"sync/atomic"

	"example.com/coolward/units"
)

// Propagate propagates the distributions of the inputs of a study through a model by the Monte Carlo
// method of JCGM 101:2008. The model is any function of a draw; it is called from many goroutines at
// once, and must give the same answer for the same draw.
//
// Trials come in blocks of 1024, each with Latin hypercubes of its own; ten are taken at least, and then
// twice as many again until the adaptive procedure of JCGM 101:2008, 7.9, is content: the mean, the standard
// uncertainty and both ends of the coverage interval are certain to the tolerance that belongs to
// the digits that the study asks for. Where it is not content after the trials allowed, the result
// says so. (The procedure has blocks of 10 000 and two at least. Ten make their standard deviation one
// that can be relied on, and hypercubes make up for the size.)
//
// A case for which the model returns an error, or a number that is not finite, is counted by its kind
// in [Result.Missing]; all else is about the cases that have an answer. If these are fewer than
// two in each tail of the interval the error is a [*NoAnswerError]. An [*units.ArgumentError] reports what is wrong with the study, an
// [*units.ConvergenceError] a model that panicked, and the error of ctx that it has ended; a call
// of the model that runs then is waited for.
func Propagate[Q Point[Q, S], S Difference[S]](ctx context.Context, s *Study, model func(Draw) (Q, error)) (Result[Q, S], error) {
	var none Result[Q, S]
	c, err := s.check()
	if err != nil {
		return none, err
	}
	point, one := builder[Q, S](), unit[S]()
	switch {
	case ctx == nil:
		return none, &units.ArgumentError{Field: "context", Accepted: "a context, such as context.Background()"}
	case model == nil:
		return none, &units.ArgumentError{Field: "model", Accepted: "a function of a draw"}
	case point == nil:
		return none, unknownKind("answer")
	}
	var foreign atomic.Pointer[units.ArgumentError]
	run := run{settings: c, ctx: ctx, model: func(row []float64) (float64, error) {
		return number(model(Draw{row, c.specs, &foreign}))
	}}
	sum, err := run.adapt()
	if fault := foreign.Load(); fault != nil {
		return none, fault
	}
	if err != nil {
		return none, err
	}
	return newResult[Q](c, sum, point, one.Scale), nil
}

// A run evaluates blocks on many workers.
type run struct {
	settings
	ctx   context.Context
	model func(row []float64) (float64, error)

	blocks        []*block
	mutex         sync.Mutex // of done
	done, planned int
}

// adapt adds blocks until their results are certain enough (JCGM 101:2008, 7.9.4).
func (r *run) adapt() (*summary, error) {
	for n := leastBlocks; ; n = min(2*n, r.settings.blocks) {
		if err := r.extend(n); err != nil {
			return nil, err
		}
		sum, err := r.summarise()
		if err != nil {
			return nil, err
		}
		sum.evaluations = r.done
		if sum.converged || n >= r.settings.blocks {
			return sum, nil
		}
	}
}

// summarise leaves the summary, which takes long for millions of trials, to itself if the context ends meanwhile.
func (r *run) summarise() (*summary, error) {
	type outcome struct {
		sum *summary
		err error
	}
	ready := make(chan outcome, 1)
	go func() {
		sum, err := summarise(r.settings, r.blocks)
		ready <- outcome{sum, err}
	}()
	select {
	case <-r.ctx.Done():
		return nil, r.ctx.Err()
	case o := <-ready:
		return o.sum, o.err
	}
}

// extend evaluates blocks until there are n. Which worker evaluates a block makes no difference.
func (r *run) extend(n int) error {
	first := len(r.blocks)
	r.blocks = append(r.blocks, make([]*block, n-first)...)
	for i := first; i < n; i++ {
		r.planned += r.evaluations(r.effects(i))
	}
	ctx, cancel := context.WithCancel(r.ctx)
	defer cancel()
	var next atomic.Int64
	next.Store(int64(first))
	var broken atomic.Pointer[units.ConvergenceError]
	var workers sync.WaitGroup
	for range min(r.workers, n-first) {
		workers.Go(func() {
			defer func() {
				if p := recover(); p != nil {
					broken.CompareAndSwap(nil, panicked(p))
					cancel()
				}
			}()
			s := newSampler(r.settings, r.model, ctx.Done(), r.count)
			for {
				i := int(next.Add(1)) - 1
				if i >= n {
					return
				}
				b, err := s.run(i, r.effects(i))
				if err != nil {
					return
				}
				r.blocks[i] = b
			}
		})
	}
	workers.Wait()
	if err := broken.Load(); err != nil {
		return err
	}
	return r.ctx.Err()
}

// effects reports whether a block is one of those from which the shares are computed.
func (r *run) effects(i int) bool { return r.shares && i < leastBlocks }

func (r *run) count(evaluations int) {
	r.mutex.Lock()
	defer r.mutex.Unlock()
	r.done += evaluations
	if r.progress != nil {
		r.progress(r.done, r.planned)
	}
}

func panicked(p any) *units.ConvergenceError {
	return &units.ConvergenceError{
		Method: "propagation of distributions", Reason: "the model panicked; mend it",
		Cause: fmt.Errorf("%v\n%s", p, debug.Stack()),
	}
}
