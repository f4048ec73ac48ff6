package rosenbrock

import (
	"math/bits"
	"sort"
)

// A History is a solution that was computed: the states at the ends of the steps and the continuous
// extension between them.
type History struct {
	n      int
	times  []float64
	first  []float64
	size   int         // steps in the first blocks
	blocks [][]float64 // records of d2, d3 and the new state
}

// inBlock is how many steps the first blocks of storage hold, if their number is not known. Blocks hold twice as many whenever
// the number of steps has doubled, so that a solution takes few allocations, and less than half more than it needs.
const (
	inBlock    = 8
	blocksEach = 2 // before they double
)

// newHistory returns one of so many steps, or of an unknown number if that is 0.
func newHistory(y0 []float64, steps int) *History {
	h := &History{n: len(y0), first: append([]float64(nil), y0...), size: inBlock}
	if steps > 0 {
		h.size = steps
	}
	h.times = make([]float64, 1, max(8*inBlock, steps+1))
	return h
}

// grow appends a step that ends at t and returns the places of its vectors.
func (h *History) grow(t float64) (d2, d3, y []float64) {
	k := h.Steps()
	if block, _, size := h.blockOf(k); block == len(h.blocks) {
		h.blocks = append(h.blocks, make([]float64, 3*h.n*size))
	}
	h.times = append(h.times, t)
	return h.record(k)
}

// blockOf returns the block that holds step k, its first step and how many it holds.
func (h *History) blockOf(k int) (block, start, size int) {
	size = h.size
	if k < size {
		return 0, 0, size
	}
	if level := bits.Len(uint(k / (blocksEach * size))); level > 0 {
		start = blocksEach * size << (level - 1)
		block = blocksEach * level
		size <<= level - 1
	}
	i := (k - start) / size
	return block + i, start + i*size, size
}

func (h *History) record(k int) (d2, d3, y []float64) {
	block, start, _ := h.blockOf(k)
	r := h.blocks[block][3*h.n*(k-start):]
	n := h.n
	return r[:n:n], r[n : 2*n : 2*n], r[2*n : 3*n : 3*n]
}

// Steps returns the number of steps.
func (h *History) Steps() int { return len(h.times) - 1 }

// Time returns the time at which step k begins; Time(Steps()) is the end.
func (h *History) Time(k int) float64 { return h.times[k] }

// End returns the time at which the solution ends.
func (h *History) End() float64 { return h.times[len(h.times)-1] }

// State returns the state at Time(k). It must not be changed.
func (h *History) State(k int) []float64 {
	if k == 0 {
		return h.first
	}
	_, _, y := h.record(k - 1)
	return y
}

// Find returns the step that holds t and the fraction of it that has passed. A time outside the
// solution is taken to its nearest end.
func (h *History) Find(t float64) (k int, s float64) {
	steps := h.Steps()
	if steps == 0 || !(t > h.times[0]) {
		return 0, 0
	}
	k = min(sort.SearchFloat64s(h.times, t), steps) - 1
	t0, t1 := h.times[k], h.times[k+1]
	return k, min((t-t0)/(t1-t0), 1)
}

// Value returns component i in step k after the fraction s of it.
func (h *History) Value(k int, s float64, i int) float64 {
	if s <= 0 || h.Steps() == 0 {
		return h.State(k)[i]
	}
	d2, d3, y1 := h.record(k)
	if s >= 1 {
		return y1[i]
	}
	y0 := h.State(k)[i]
	// y0 + s (y1 − y0) keeps a state that does not change to the last bit.
	return y0 + s*((y1[i]-y0)+(1-s)*(d2[i]+s*d3[i]))
}

// Cubic returns the coefficients of component i in step k as a polynomial in the fraction s:
// p[0] + p[1] s + p[2] s² + p[3] s³.
func (h *History) Cubic(k, i int) (p [4]float64) {
	y0 := h.State(k)[i]
	if h.Steps() == 0 {
		return [4]float64{y0}
	}
	d2, d3, y1 := h.record(k)
	return [4]float64{y0, y1[i] - y0 + d2[i], d3[i] - d2[i], -d3[i]}
}
