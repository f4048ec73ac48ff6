package fv

import (
	"math"
	"slices"

	"gonum.org/v1/gonum/integrate/quad"
)

const (
	fewest   = 4    // intervals per piece to begin with
	deepest  = 13   // how often one of them is halved at most
	mostBins = 4096 // of the index
	mostEven = 512  // cubics of equal width
	nodesGL  = 3    // points of the quadrature of k over one interval

	agreement = 0.01  // of dT/du in the middle of an interval with the cubic there, relative
	flat      = 1e-12 // relative change of a property below which it counts as constant
)

// A knot is a node of a table while it is made.
type knot struct{ u, T, slope, k, phi float64 }

// NewTable makes a table from temperature low to high, within which start lies, and the kinks in
// rising order. It halves intervals, in temperature, until the values of the material in the middle are met to
// within bound, in kelvin; what is kept is the next halving. At a kink the enthalpy may jump, as at a melting
// point.
//
// It returns the error of the material, or a [*PropertyError].
func NewTable(m Material, start, low, high float64, kinks []float64, bound float64) (*Table, error) {
	b := builder{m: m, bound: bound}
	quad.Legendre{}.FixedLocations(b.x[:], b.w[:], 0, 1)
	var err error
	if b.zero, err = m.Enthalpy(start); err != nil {
		return nil, err
	}
	ends := append(append([]float64{low}, kinks...), high)
	for i := range len(ends) - 1 {
		if !(ends[i] < ends[i+1]) {
			return nil, &PropertyError{"kink", ends[i], ends[i+1], "temperatures in rising order"}
		}
	}
	// A node at the start gives back the start to the last bit.
	i, found := slices.BinarySearch(ends, start)
	if !found {
		ends = slices.Insert(ends, i, start)
	}
	b.kink = found
	b.table = &Table{Low: low, High: high, start: start, cubics: make([]cubic, 1, 64)}
	for i := range len(ends) - 1 {
		if err := b.piece(ends[i], ends[i+1]); err != nil {
			return nil, err
		}
	}
	b.finish()
	return b.table, nil
}

// A builder makes a table.
type builder struct {
	m     Material
	zero  float64 // specific enthalpy at the start
	bound float64
	x, w  [nodesGL]float64
	table *Table
	phi   float64 // at the end of what was made
	last  float64 // u there
	kink  bool    // one was declared at the start, or it is an end
}

// piece adds what lies between two temperatures.
func (b *builder) piece(low, high float64) error {
	// Slopes are those inside the piece, where a property may jump at its ends.
	inside := 1e-9 * (high - low)
	from, err := b.knot(low, low+inside)
	if err != nil {
		return err
	}
	to, err := b.knot(high, high-inside)
	if err != nil {
		return err
	}
	if from.u, err = b.beside(from, math.Nextafter(low, high)); err != nil {
		return err
	}
	if to.u, err = b.beside(to, math.Nextafter(high, low)); err != nil {
		return err
	}
	if width := to.u - from.u; !(width > 0 && width <= math.MaxFloat64) {
		return b.notRising(to)
	}
	t := b.table
	if len(t.pieces) > 0 {
		if !(from.u >= b.last) {
			return b.notRising(from)
		}
		if from.u > b.last { // it melts here
			t.cubics = append(t.cubics, cubic{from: b.last, inverse: 1 / (from.u - b.last), t0: low, p0: b.phi})
			n := len(t.cubics) - 1
			t.pieces = append(t.pieces, piece{b.last, from.u, n, n})
		}
	}
	n := len(t.cubics)
	before := from
	for i := 1; i <= fewest; i++ {
		next := to
		if i < fewest {
			T := low + float64(i)/fewest*(high-low)
			if next, err = b.knot(T, T); err != nil {
				return err
			}
			if err := b.inverse(next, high-low); err != nil {
				return err
			}
		}
		if err := b.interval(before, next, 0); err != nil {
			return err
		}
		before = next
	}
	t.pieces = append(t.pieces, piece{from.u, to.u, n, len(t.cubics) - 1})
	b.last = to.u
	return nil
}

// jump is the rise of the enthalpy at one temperature that counts as melting, over the specific heat; K.
const jump = 1e-6

// beside returns u at the side of a knot on which another temperature lies, the next one: not that of the knot
// itself where the enthalpy jumps.
func (b *builder) beside(k knot, T float64) (float64, error) {
	h, err := b.m.Enthalpy(T)
	if err != nil {
		return 0, err
	}
	if u := b.m.Density * (h - b.zero); math.Abs(u-k.u)*k.slope > jump {
		return u, nil
	}
	return k.u, nil
}

func (b *builder) notRising(k knot) error {
	return &PropertyError{"enthalpy", k.T, k.u/b.m.Density + b.zero, "rising with temperature"}
}

// inverse checks that the temperature of the material is the inverse of its enthalpy.
func (b *builder) inverse(k knot, width float64) error {
	T, err := b.m.Temperature(k.u/b.m.Density + b.zero)
	if err != nil {
		return err
	}
	if !(math.Abs(T-k.T) <= agreement*width) {
		return &PropertyError{"temperature", k.T, T, "the inverse of the enthalpy"}
	}
	return nil
}

// interval adds what lies between two knots, in two or more parts.
func (b *builder) interval(from, to knot, depth int) error {
	T := from.T + (to.T-from.T)/2
	middle, err := b.knot(T, T)
	if err != nil {
		return err
	}
	if !(middle.u > from.u && middle.u < to.u) {
		return b.notRising(middle)
	}
	p, err := b.potential(from.T, middle.T)
	if err != nil {
		return err
	}
	q, err := b.potential(middle.T, to.T)
	if err != nil {
		return err
	}
	c := hermite(from, to, b.phi, b.phi+p+q)
	s := (middle.u - from.u) * c.inverse
	worst := max(math.Abs(c.t0+s*(c.t1+s*(c.t2+s*c.t3))-T), math.Abs(c.p0+s*(c.p1+s*(c.p2+s*c.p3))-(b.phi+p))/middle.k)
	slope := (c.t1 + s*(2*c.t2+s*3*c.t3)) * c.inverse
	agrees := math.Abs(slope-middle.slope) <= agreement*middle.slope
	if !(worst <= b.bound && agrees && rising(c.t1, c.t2, c.t3) && rising(c.p1, c.p2, c.p3)) && depth < deepest {
		if err := b.interval(from, middle, depth+1); err != nil {
			return err
		}
		return b.interval(middle, to, depth+1)
	}
	if !agrees {
		return &PropertyError{"specific heat", T, 1 / (middle.slope * b.m.Density), "the derivative of the enthalpy, with a kink declared where it jumps"}
	}
	t := b.table
	t.Error = max(t.Error, worst)
	t.cubics = append(t.cubics, hermite(from, middle, b.phi, b.phi+p), hermite(middle, to, b.phi+p, b.phi+p+q))
	b.phi += p + q
	return nil
}

// finish adds the linear continuations at both ends and the index, and lets the potential begin at u = 0.
func (b *builder) finish() {
	t := b.table
	f, l := t.cubics[1], t.cubics[len(t.cubics)-1]
	t.lowU, t.highU = f.from, b.last
	t.cubics[0] = cubic{from: f.from, inverse: f.inverse, t0: f.t0, t1: f.t1, p0: f.p0, p1: f.p1}
	t.cubics = append(t.cubics, cubic{
		from: b.last, inverse: l.inverse,
		t0: l.t0 + l.t1 + l.t2 + l.t3, t1: l.t1 + 2*l.t2 + 3*l.t3,
		p0: l.p0 + l.p1 + l.p2 + l.p3, p1: l.p1 + 2*l.p2 + 3*l.p3,
	})
	narrowest := math.Inf(1)
	n := t.Size()
	for _, c := range t.cubics[1 : n+1] {
		narrowest = min(narrowest, 1/c.inverse)
	}
	width := t.highU - t.lowU
	bins := int(min(max(width/narrowest, float64(n))+1, mostBins))
	t.perBin = float64(bins) / width
	t.bins = make([]int32, bins+1)
	for i, j := 0, 1; i <= bins; i++ {
		for j <= n && t.lowU+float64(i)/t.perBin >= t.cubics[j+1].from {
			j++
		}
		t.bins[i] = int32(j)
	}
	t.bins[bins] = int32(n + 1)
	c, s, _ := t.at(0)
	origin := c.p0 + s*(c.p1+s*(c.p2+s*c.p3))
	for i := range t.cubics {
		t.cubics[i].p0 -= origin
	}
	t.spread(b.bound, b.kink)
	t.slope, t.rise = f.t1*f.inverse, f.p1*f.inverse
	t.straight = true
	k := t.rise / t.slope
	for _, c := range t.cubics[1 : n+1] {
		if !(abs(c.t1*c.inverse-t.slope) <= flat*t.slope && abs(c.p1*c.inverse-t.rise) <= flat*t.rise &&
			abs(c.t2)+abs(c.t3) <= flat*abs(c.t0) && abs(c.p2)+abs(c.p3) <= flat*k*abs(c.t0)) {
			t.straight = false
		}
	}
}

// spread makes the cubics of equal width for the widest stretch without a kink from those that are there, unless
// too many would be needed to stay within bound of them. The start is no kink unless it was declared as one.
func (t *Table) spread(bound float64, kink bool) {
	var w, now piece
	for i, p := range t.pieces {
		if i > 0 && p.from == 0 && now.to == 0 && !kink {
			now.to, now.last = p.to, p.last
		} else {
			now = p
		}
		if now.to-now.from > w.to-w.from {
			w = now
		}
	}
	var store []cubic
	for n := fewest; n <= mostEven; n *= 2 {
		e := even{cubics: store[:0], inverse: float64(n) / (w.to - w.from)}
		if e.zero = -w.from * e.inverse; w.from < 0 && w.to >= 0 {
			e.zero = math.Ceil(e.zero)
			e.inverse = -e.zero / w.from
		}
		origin := e.zero + w.from*e.inverse
		worst, j := 0.0, w.first
		read := func(x float64) knot {
			u := (x - e.zero) / e.inverse
			for j < w.last && t.cubics[j+1].from <= u {
				j++
			}
			return t.cubics[j].knot(u)
		}
		before := read(origin)
		for x := 0.0; worst <= bound && (x+1-e.zero)/e.inverse <= w.to; x++ {
			middle := read(x + 0.5)
			next := read(x + 1)
			c := hermite(before, next, before.phi, next.phi)
			worst = max(worst, abs(c.t0+(c.t1+(c.t2+c.t3/2)/2)/2-middle.T), abs(c.p0+(c.p1+(c.p2+c.p3/2)/2)/2-middle.phi)/middle.k)
			e.cubics, before = append(e.cubics, c), next
		}
		if worst <= bound {
			t.widest = e
			t.Error += worst
			return
		}
		store = e.cubics
	}
}

// knot returns the values of a cubic.
func (c *cubic) knot(u float64) knot {
	s := (u - c.from) * c.inverse
	slope, rise := c.t1+s*(2*c.t2+s*3*c.t3), c.p1+s*(2*c.p2+s*3*c.p3)
	return knot{u, c.t0 + s*(c.t1+s*(c.t2+s*c.t3)), slope * c.inverse, rise / slope, c.p0 + s*(c.p1+s*(c.p2+s*c.p3))}
}

// hermite returns the cubics between two knots whose potentials are p and q.
func hermite(a, b knot, p, q float64) cubic {
	width := b.u - a.u
	t1, te := a.slope*width, b.slope*width
	p1, pe := a.k*a.slope*width, b.k*b.slope*width
	dT, dP := b.T-a.T, q-p
	return cubic{
		a.T, t1, 3*dT - 2*t1 - te, t1 + te - 2*dT,
		p, p1, 3*dP - 2*p1 - pe, p1 + pe - 2*dP,
		a.u, 1 / width,
	}
}

// rising reports whether a cubic Hermite function rises throughout: sufficient is that both slopes
// are between 0 and 3 secants (F. N. Fritsch and R. E. Carlson, SIAM J. Numer. Anal. 17, 1980).
func rising(c1, c2, c3 float64) bool {
	secant, end := c1+c2+c3, c1+2*c2+3*c3
	return c1 >= 0 && end >= 0 && c1 <= 3*secant && end <= 3*secant
}

const positive = "finite and above 0"

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

// potential returns the integral of the conductivity between two temperatures, by a Gauss-Legendre quadrature.
func (b *builder) potential(from, to float64) (float64, error) {
	sum := 0.0
	for j, x := range b.x {
		T := from + x*(to-from)
		k, err := b.m.Conductivity(T)
		if err != nil {
			return 0, err
		}
		if !(k > 0 && k <= math.MaxFloat64) {
			return 0, &PropertyError{"conductivity", T, k, positive}
		}
		sum += b.w[j] * k
	}
	return sum * (to - from), nil
}

func abs(x float64) float64 { return max(x, -x) }
