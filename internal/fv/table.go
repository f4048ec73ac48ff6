package fv

import (
	"fmt"
	"math"
	"slices"

	"gonum.org/v1/gonum/integrate/quad"
)

// A Material is what a table is made of: the properties at a temperature, the temperature at a
// specific enthalpy, and the density.
type Material struct {
	Density      float64
	Conductivity func(T float64) (float64, error)
	SpecificHeat func(T float64) (float64, error)
	Enthalpy     func(T float64) (float64, error)
	Temperature  func(h float64) (float64, error)
}

// A PropertyError reports a property that cannot be.
type PropertyError struct {
	Property    string  // "conductivity", "specific heat", "enthalpy" or "temperature"
	Temperature float64 // where
	Value       float64 // what was given
	Reason      string  // what would have been accepted
}

func (e *PropertyError) Error() string {
	return fmt.Sprintf("%s %g at %g K: accepted is %s", e.Property, e.Value, e.Temperature, e.Reason)
}

// A Table gives temperature and potential Φ = ∫k dT over the enthalpy u per volume, both
// counted from the temperature of the start. Both are cubic Hermite functions
// with exact slopes between nodes that are equidistant in u from kink to kink of the material. Beyond
// its range it goes on along the tangents, for the trial states of an integrator.
type Table struct {
	Low, High   float64 // range of temperature
	Error       float64 // largest error of T, and of Φ over k, that was found between nodes; K
	lowU, highU float64
	pieces      []piece
	cubics      []cubic // of all pieces, with a tangent at either end
	widest      piece   // where most states lie
}

// A piece is what lies between two kinks.
type piece struct {
	from, to float64 // u
	inverse  float64 // number of intervals per u
	first    int     // index of its first cubic
	last     int     // index of its last cubic
}

// A cubic holds temperature and potential in one interval as polynomials of its fraction s: 64 bytes.
type cubic struct{ t0, t1, t2, t3, p0, p1, p2, p3 float64 }

// Size returns the number of intervals.
func (t *Table) Size() int { return len(t.cubics) - 2 }

// at returns the interval that holds u, the fraction of it, and its inverse width.
func (t *Table) at(u float64) (c *cubic, s, inverse float64) {
	p := &t.pieces[0]
	if len(t.pieces) > 1 {
		k := 0
		for k < len(t.pieces)-1 && u >= t.pieces[k].to {
			k++
		}
		p = &t.pieces[k]
	}
	x := (u - p.from) * p.inverse
	if !(x >= 0) { // NaN included
		return &t.cubics[0], x, p.inverse // only the first piece can come here
	}
	if u >= t.highU {
		return &t.cubics[len(t.cubics)-1], (u - t.highU) * p.inverse, p.inverse
	}
	j := min(p.first+int(x), p.last)
	return &t.cubics[j], x - float64(j-p.first), p.inverse
}

// Temperature returns the temperature at u.
func (t *Table) Temperature(u float64) float64 {
	c, s, _ := t.at(u)
	return c.t0 + s*(c.t1+s*(c.t2+s*c.t3))
}

// Slope returns the temperature at u and its derivative.
func (t *Table) Slope(u float64) (T, slope float64) {
	c, s, inverse := t.at(u)
	return c.t0 + s*(c.t1+s*(c.t2+s*c.t3)), (c.t1 + s*(2*c.t2+s*3*c.t3)) * inverse
}

// potentials sets phi[i] = Φ(e[i] perVolume[i]).
func (t *Table) potentials(e, perVolume, phi []float64) {
	n := len(phi)
	e, perVolume = e[:n], perVolume[:n]
	from, inverse, inside := t.widest.from, t.widest.inverse, float64(t.widest.last-t.widest.first+1)
	cubics := t.cubics[t.widest.first:]
	for i := range phi {
		u := e[i] * perVolume[i]
		x := (u - from) * inverse
		var c *cubic
		var s float64
		if x >= 0 && x < inside { // the common case of at, in line
			j := int(x)
			c, s = &cubics[j], x-float64(j)
		} else {
			c, s, _ = t.at(u)
		}
		phi[i] = c.p0 + s*(c.p1+s*(c.p2+s*c.p3))
	}
}

// slopes sets phi[i] as potentials does, and the derivatives of potential and temperature to e[i].
func (t *Table) slopes(e, perVolume, phi, dphi, dT []float64) {
	n := len(phi)
	e, perVolume, dphi, dT = e[:n], perVolume[:n], dphi[:n], dT[:n]
	for i := range phi {
		c, s, inverse := t.at(e[i] * perVolume[i])
		inverse *= perVolume[i]
		phi[i] = c.p0 + s*(c.p1+s*(c.p2+s*c.p3))
		dphi[i] = (c.p1 + s*(2*c.p2+s*3*c.p3)) * inverse
		dT[i] = (c.t1 + s*(2*c.t2+s*3*c.t3)) * inverse
	}
}

const (
	fewest  = 8       // intervals per piece to begin with
	most    = 1 << 15 // and at the end
	nodesGL = 3       // points of the quadrature of k over one interval

	agreement = 0.01 // of dT/du midway between knots with the cubic there, relative
)

// A knot is a node of a table while it is made.
type knot struct{ u, T, slope, k float64 }

// NewTable makes a table from temperature low to high, within which start lies, and the kinks in
// rising order. It doubles the intervals of each piece until the values of the material midway
// between nodes are met to within bound, in kelvin; what is kept is the next doubling.
//
// It returns the error of the material, or a [*PropertyError].
func NewTable(m Material, start, low, high float64, kinks []float64, bound float64) (*Table, error) {
	b := builder{m: m, bound: bound}
	quad.Legendre{}.FixedLocations(b.x[:], b.w[:], 0, 1)
	var err error
	if b.zero, err = m.Enthalpy(start); err != nil {
		return nil, err
	}
	t := &Table{Low: low, High: high}
	ends := append(append([]float64{low}, kinks...), high)
	t.cubics = append(t.cubics, cubic{})
	for i := range len(ends) - 1 {
		if !(ends[i] < ends[i+1]) {
			return nil, &PropertyError{"kink", ends[i], ends[i+1], "temperatures in rising order"}
		}
	}
	// A node at the start gives back the start to the last bit.
	if i, found := slices.BinarySearch(ends, start); !found {
		ends = slices.Insert(ends, i, start)
	}
	phi := 0.0
	for i := range len(ends) - 1 {
		knots, phis, worst, err := b.piece(ends[i], ends[i+1])
		if err != nil {
			return nil, err
		}
		t.Error = max(t.Error, worst)
		n := len(knots) - 1
		from, to := knots[0].u, knots[n].u
		p := piece{from, to, float64(n) / (to - from), len(t.cubics), len(t.cubics) + n - 1}
		if i == 0 {
			t.lowU = from
		}
		t.highU = to
		for j := range n {
			t.cubics = append(t.cubics, hermite(knots[j], knots[j+1], phi+phis[j], phi+phis[j+1], 1/p.inverse))
		}
		phi += phis[n]
		t.pieces = append(t.pieces, p)
		if p.to-p.from > t.widest.to-t.widest.from {
			t.widest = p
		}
	}
	t.tangents()
	c, s, _ := t.at(0)
	origin := c.p0 + s*(c.p1+s*(c.p2+s*c.p3))
	for i := range t.cubics {
		t.cubics[i].p0 -= origin
	}
	return t, nil
}

// tangents makes the linear continuations at both ends.
func (t *Table) tangents() {
	f := t.cubics[1]
	t.cubics[0] = cubic{t0: f.t0, t1: f.t1, p0: f.p0, p1: f.p1}
	l := t.cubics[len(t.cubics)-1]
	t.cubics = append(t.cubics, cubic{
		t0: l.t0 + l.t1 + l.t2 + l.t3, t1: l.t1 + 2*l.t2 + 3*l.t3,
		p0: l.p0 + l.p1 + l.p2 + l.p3, p1: l.p1 + 2*l.p2 + 3*l.p3,
	})
}

// hermite returns the cubics between two knots whose potentials are p and q.
func hermite(a, b knot, p, q, width float64) cubic {
	t1, te := a.slope*width, b.slope*width
	p1, pe := a.k*a.slope*width, b.k*b.slope*width
	dT, dP := b.T-a.T, q-p
	return cubic{
		a.T, t1, 3*dT - 2*t1 - te, t1 + te - 2*dT,
		p, p1, 3*dP - 2*p1 - pe, p1 + pe - 2*dP,
	}
}

const positive = "finite and above 0"

// A builder makes the pieces of a table.
type builder struct {
	m     Material
	zero  float64 // specific enthalpy at the start
	bound float64
	x, w  [nodesGL]float64
}

// piece returns the knots of the piece between two temperatures, the potentials at them, and the
// largest error that half as many had midway.
func (b *builder) piece(low, high float64) (knots []knot, phi []float64, worst float64, err error) {
	// Slopes are those inside the piece, where a property may jump at its ends.
	inside := 1e-9 * (high - low)
	first, err := b.knot(low, low+inside)
	if err != nil {
		return nil, nil, 0, err
	}
	last, err := b.knot(high, high-inside)
	if err != nil {
		return nil, nil, 0, err
	}
	if width := last.u - first.u; !(width > 0 && width <= math.MaxFloat64) {
		return nil, nil, 0, &PropertyError{"enthalpy", high, last.u/b.m.Density + b.zero, "rising with temperature"}
	}
	knots = append(knots, first)
	for i := 1; i < fewest; i++ {
		k, err := b.inverse(first, last, float64(i)/fewest)
		if err != nil {
			return nil, nil, 0, err
		}
		knots = append(knots, k)
	}
	knots = append(knots, last)
	for {
		n := len(knots) - 1
		finer := make([]knot, 0, 2*n+1)
		for i := range n {
			k, err := b.inverse(first, last, (float64(i)+0.5)/float64(n))
			if err != nil {
				return nil, nil, 0, err
			}
			finer = append(finer, knots[i], k)
		}
		finer = append(finer, last)
		phi, err = b.potentials(finer)
		if err != nil {
			return nil, nil, 0, err
		}
		worst = 0
		monotone := true
		contradiction := -1
		for i := range n {
			k := &finer[2*i+1]
			c := hermite(knots[i], knots[i+1], phi[2*i], phi[2*i+2], (last.u-first.u)/float64(n))
			worst = max(worst,
				math.Abs(c.t0+(c.t1+(c.t2+c.t3/2)/2)/2-k.T),
				math.Abs(c.p0+(c.p1+(c.p2+c.p3/2)/2)/2-phi[2*i+1])/k.k)
			if slope := (c.t1 + c.t2 + 0.75*c.t3) * float64(n) / (last.u - first.u); !(math.Abs(slope-k.slope) <= agreement*k.slope) {
				contradiction = 2*i + 1
			}
			monotone = monotone && rising(c.t0, c.t1, c.t2, c.t3) && rising(c.p0, c.p1, c.p2, c.p3)
		}
		knots = finer
		if (worst <= b.bound && monotone && contradiction < 0) || 2*n >= most {
			if contradiction >= 0 {
				k := knots[contradiction]
				return nil, nil, 0, &PropertyError{"specific heat", k.T, 1 / (k.slope * b.m.Density), "the derivative of the enthalpy, with a kink declared where it jumps"}
			}
			return knots, phi, worst, nil
		}
	}
}

// rising reports whether a cubic Hermite function rises throughout: sufficient is that both slopes
// are between 0 and 3 secants (F. N. Fritsch and R. E. Carlson, SIAM J. Numer. Anal. 17, 1980).
func rising(_, c1, c2, c3 float64) bool {
	secant, end := c1+c2+c3, c1+2*c2+3*c3
	return c1 >= 0 && end >= 0 && c1 <= 3*secant && end <= 3*secant
}

// inverse returns the knot at a fraction of the enthalpy between two others.
func (b *builder) inverse(first, last knot, fraction float64) (knot, error) {
	u := first.u + fraction*(last.u-first.u)
	T, err := b.m.Temperature(u/b.m.Density + b.zero)
	if err != nil {
		return knot{}, err
	}
	if !(T > first.T && T < last.T) {
		return knot{}, &PropertyError{"temperature", first.T, T, "the inverse of the enthalpy"}
	}
	k, err := b.knot(T, T)
	k.u = u
	return k, err
}

// knot returns the knot at temperature T with the slopes at another one next to it.
func (b *builder) knot(T, slopesAt float64) (knot, error) {
	h, err := b.m.Enthalpy(T)
	if err != nil {
		return knot{}, err
	}
	c, err := b.m.SpecificHeat(slopesAt)
	if err != nil {
		return knot{}, err
	}
	k, err := b.m.Conductivity(slopesAt)
	if err != nil {
		return knot{}, err
	}
	for _, p := range []struct {
		name  string
		value float64
	}{{"specific heat", c}, {"conductivity", k}} {
		if !(p.value > 0 && p.value <= math.MaxFloat64) {
			return knot{}, &PropertyError{p.name, T, p.value, positive}
		}
	}
	if math.IsNaN(h) || math.IsInf(h, 0) {
		return knot{}, &PropertyError{"enthalpy", T, h, "finite"}
	}
	return knot{u: b.m.Density * (h - b.zero), T: T, slope: 1 / (b.m.Density * c), k: k}, nil
}

// potentials returns the integral of the conductivity from the first knot to each, by a Gauss-Legendre
// quadrature between neighbours.
func (b *builder) potentials(knots []knot) ([]float64, error) {
	phi := make([]float64, len(knots))
	for i := 1; i < len(knots); i++ {
		from, width := knots[i-1].T, knots[i].T-knots[i-1].T
		sum := 0.0
		for j, x := range b.x {
			k, err := b.m.Conductivity(from + x*width)
			if err != nil {
				return nil, err
			}
			if !(k > 0 && k <= math.MaxFloat64) {
				return nil, &PropertyError{"conductivity", from + x*width, k, positive}
			}
			sum += b.w[j] * k
		}
		phi[i] = phi[i-1] + sum*width
	}
	return phi, nil
}

// Constant reports whether conductivity and specific heat are constant, to rounding.
func (t *Table) Constant() bool {
	slope, k := t.cubics[0].t1*t.pieces[0].inverse, t.cubics[0].p1/t.cubics[0].t1
	for i := range t.pieces {
		p := &t.pieces[i]
		for _, c := range t.cubics[p.first : p.last+1] {
			if abs(c.t1*p.inverse-slope) > flat*slope || abs(c.p1/c.t1-k) > flat*k ||
				abs(c.t2)+abs(c.t3) > flat*c.t0 || abs(c.p2)+abs(c.p3) > flat*k*c.t0 {
				return false
			}
		}
	}
	return true
}

// flat is the relative change of a property below which it counts as constant.
const flat = 1e-12

func abs(x float64) float64 { return max(x, -x) }
