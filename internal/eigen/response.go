package eigen

import "math"

// A Response is how a place answers to surroundings of changing temperature: θ and its integral as the terms of the
// series, and a table of what the terms left out add at early times. It does not change.
type Response struct {
	solution Solution
	place    place
	count    int
	c, rate  [CylinderTerms]float64
	join     float64
	rest     float64 // the integral less that of the terms, from the join on
	table    [tablePieces + 1]node
}

// A node holds the integral less that of the terms at Fo = join (i/tablePieces)², and its derivative over i.
type node struct{ value, slope float64 }

const (
	tablePieces = 256
	firstPieces = 4
)

// NewResponse returns the response at the fraction x of the way from the centre to the surface.
func NewResponse(s Solution, x float64) *Response { return newResponse(s, place{x: x}) }

// NewResponseOfMean returns the response of the mean over the volume.
func NewResponseOfMean(s Solution) *Response { return newResponse(s, place{mean: true}) }

func newResponse(s Solution, p place) *Response {
	r := &Response{solution: s, place: p, join: s.Join()}
	for n := range r.c {
		c, rate, ok := s.term(n+1, p)
		if !ok {
			break
		}
		r.c[n], r.rate[n], r.count = c, rate, n+1
	}
	for i := range r.table {
		v := float64(i) / tablePieces
		fo := r.join * v * v
		r.table[i] = node{early(s, p, fo) - settled(s, p, fo), r.Missing(fo) * 2 * r.join * v / tablePieces}
	}
	r.rest = r.table[tablePieces].value
	return r
}

// Terms returns the coefficients and rates of the series; they are not to be changed.
func (r *Response) Terms() (c, rate []float64) { return r.c[:r.count], r.rate[:r.count] }

// Join returns the Fourier number from which the terms alone give θ.
func (r *Response) Join() float64 { return r.join }

// Theta returns θ after a step.
func (r *Response) Theta(fo float64) float64 {
	if r.place.mean {
		return r.solution.Mean(fo)
	}
	return r.solution.At(r.place.x, fo)
}

// Missing returns what θ is above the sum of the terms.
func (r *Response) Missing(fo float64) float64 {
	if fo >= r.join {
		return 0
	}
	theta := r.Theta(fo)
	for n := range r.count {
		theta -= r.c[n] * math.Exp(-r.rate[n]*fo)
	}
	return theta
}

// MissingIntegral returns what the integral of θ is above that of the terms, and the derivative of that, which is
// what θ itself is above them. Both are from the table by cubic interpolation, good to 2e-11 of a Fourier number
// and to 1e-6; in its first pieces, which a large Biot number or a place near the surface does not leave smooth, they
// are computed.
func (r *Response) MissingIntegral(fo float64) (value, theta float64) {
	if fo >= r.join {
		return r.rest, 0
	}
	v := math.Sqrt(fo/r.join) * tablePieces
	if v < firstPieces {
		return early(r.solution, r.place, fo) - settled(r.solution, r.place, fo), r.Missing(fo)
	}
	i := min(int(v), tablePieces-1)
	a, b, u := r.table[i], r.table[i+1], v-float64(i)
	w := 1 - u
	value = w*w*((1+2*u)*a.value+u*a.slope) + u*u*((1+2*w)*b.value-w*b.slope)
	slope := 6*u*w*(b.value-a.value) + w*(w-2*u)*a.slope + u*(u-2*w)*b.slope
	return value, slope * tablePieces * tablePieces / (2 * r.join * v)
}
