package fdm

import (
	"context"
	"reflect"
	"runtime"
	"sync"

	"example.com/coolward/internal/fv"
	"example.com/coolward/units"
)

// Study solves a problem many times, on all processors at once, and returns what read takes from each solution,
// in the order of the runs whatever ends first. Before run i vary changes a copy of the base, and read is handed what
// [Problem.Solve] returned: a solution to be dropped or kept, and an error that it may answer with a value. Both are
// called from several goroutines. Runs that keep the material and the start of the base share its tables, and the runs of one processor their
// working storage, so that little but what a solution keeps is allocated. Progress of
// the base is told of the runs that are done.
//
// A study ends at the first error, by the number of the run, of vary, read or the context. It returns an
// [*units.ArgumentError] for a negative number of runs and a nil function, and else the error of the base
// if its tables cannot be made.
func Study[T any](
	ctx context.Context, base Problem, runs int, vary func(i int, p *Problem) error, read func(i int, s *Solution, err error) (T, error),
) ([]T, error) {
	switch {
	case ctx == nil:
		return nil, &units.ArgumentError{Field: "context", Accepted: "a context, such as context.Background()"}
	case runs < 0:
		return nil, &units.ArgumentError{Field: "study: runs", Value: runs, Accepted: "0 or more"}
	case vary == nil || read == nil:
		return nil, &units.ArgumentError{Field: "study", Accepted: "functions to vary the problem and to read the solution"}
	}
	shared, err := base.share()
	if err != nil {
		return nil, err
	}
	progress := base.Progress
	base.Progress = nil
	results := make([]T, runs)
	line := queue{runs: runs, failed: runs}
	var workers sync.WaitGroup
	for range min(runtime.GOMAXPROCS(0), runs) {
		workers.Go(func() {
			work := &workspace{}
			for i, ok := line.next(); ok; i, ok = line.next() {
				p := base
				p.shared = shared
				p.Layers = append([]Layer(nil), base.Layers...)
				err := ctx.Err()
				if err == nil {
					err = vary(i, &p)
				}
				if err == nil {
					p.work = work
					s, failure := p.Solve(ctx)
					results[i], err = read(i, s, failure)
				}
				line.done(i, err, progress)
			}
		})
	}
	workers.Wait()
	if line.err != nil {
		return nil, line.err
	}
	return results, nil
}

// A queue hands out the numbers of runs in order, and keeps the error of the lowest.
type queue struct {
	mutex    sync.Mutex
	at, runs int
	finished int
	failed   int // number of the run that failed
	err      error
}

func (q *queue) next() (int, bool) {
	q.mutex.Lock()
	defer q.mutex.Unlock()
	if q.at >= q.runs || q.err != nil {
		return 0, false
	}
	q.at++
	return q.at - 1, true
}

func (q *queue) done(i int, err error, progress func(float64)) {
	q.mutex.Lock()
	defer q.mutex.Unlock()
	q.finished++
	if err != nil && i < q.failed {
		q.failed, q.err = i, err
	}
	if progress != nil {
		progress(float64(q.finished) / float64(q.runs))
	}
}

// sharedTables are tables that several runs read.
type sharedTables struct {
	start     units.Temperature
	tolerance float64
	materials []Material
	tables    []*fv.Table
}

// share makes the tables of a problem over all that its materials support.
func (p Problem) share() (*sharedTables, error) {
	s, err := p.prepare()
	if err != nil {
		return nil, err
	}
	shared := &sharedTables{start: s.start, tolerance: p.tolerance()}
	for _, l := range s.wall.layers {
		if shared.of(l.Material) != nil || !canCompare(l.Material) {
			continue
		}
		low, high := supported(l.Material, s.start)
		t, err := p.tableBetween(l.Material, s.start, low, high)
		if err != nil {
			continue // each run says what is wrong with the temperatures that it needs
		}
		shared.materials = append(shared.materials, l.Material)
		shared.tables = append(shared.tables, t)
	}
	return shared, nil
}

// of returns the table of a material, or nil.
func (s *sharedTables) of(m Material) *fv.Table {
	if !canCompare(m) {
		return nil
	}
	for i, other := range s.materials {
		if other == m {
			return s.tables[i]
		}
	}
	return nil
}

// canCompare reports whether a material can be compared.
func canCompare(m Material) bool { return m != nil && reflect.ValueOf(m).Comparable() }
