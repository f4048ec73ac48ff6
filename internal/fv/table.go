package fv

import "fmt"

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
// counted from the temperature of the start. Both are cubic Hermite functions with exact slopes at knots that lie
// as close as the properties ask for. Beyond its range it goes on along the tangents, for the trial states of an
// integrator. Where a material melts at one temperature, that temperature and Φ hold over a range of u.
type Table struct {
	Low, High   float64 // range of temperature
	Error       float64 // largest error of T, and of Φ over k, that was found between knots; K
	lowU, highU float64
	pieces      []piece
	cubics      []cubic // of all pieces, with a tangent at either end
	bins        []int32 // the cubics that hold the ends of equal ranges of u
	perBin      float64 // number of bins per u
	widest      even    // of the widest stretch between kinks, where most states lie
	start       float64 // temperature at u = 0
	straight    bool    // T = start + u slope, Φ = u rise, for which nothing is looked up
	slope, rise float64
}

// A piece is what lies between two kinks, or the range of u at one temperature.
type piece struct {
	from, to    float64 // u
	first, last int     // cubics
}

// An even holds cubics of equal width, which are found without a search; none if too many are needed. The
// knot at u = 0 has a whole number, so that the temperature there is that of the start to the last bit.
type even struct {
	inverse float64 // number of intervals per u
	zero    float64 // number of the knot at u = 0
	cubics  []cubic
}

// A cubic holds temperature and potential in one interval as polynomials of its fraction s.
type cubic struct {
	t0, t1, t2, t3 float64
	p0, p1, p2, p3 float64
	from, inverse  float64 // u at s = 0, and the number of intervals per u
}

// Size returns the number of intervals.
func (t *Table) Size() int { return len(t.cubics) - 2 }

// Constant reports whether conductivity and specific heat are constant, to rounding.
func (t *Table) Constant() bool { return t.straight }

// at returns the interval that holds u, the fraction of it, and its inverse width.
func (t *Table) at(u float64) (c *cubic, s, inverse float64) {
	w := &t.widest
	if x := u*w.inverse + w.zero; x >= 0 && x < float64(len(w.cubics)) {
		j := int(x)
		return &w.cubics[j], x - float64(j), w.inverse
	}
	c = &t.cubics[t.find(u)]
	return c, (u - c.from) * c.inverse, c.inverse
}

// find returns the number of the interval that holds u.
func (t *Table) find(u float64) int {
	j := int32(0)
	if x := (u - t.lowU) * t.perBin; x >= 0 { // not for NaN
		b := int(min(x, float64(len(t.bins)-2)))
		j = t.bins[b]
		for last := t.bins[b+1]; j < last; {
			if k := (j + last + 1) / 2; u >= t.cubics[k].from {
				j = k
			} else {
				last = k - 1
			}
		}
	}
	return int(j)
}

// from returns the interval that holds u, often the one with number j, which it sets: neighbours lie near each other.
func (t *Table) from(j *int, u float64) *cubic {
	cubics, k := t.cubics, *j
	if k+1 < len(cubics) && u >= cubics[k+1].from || k > 0 && u < cubics[k].from {
		k = t.find(u)
		*j = k
	}
	return &cubics[k]
}

// Temperature returns the temperature at u.
func (t *Table) Temperature(u float64) float64 {
	if t.straight {
		return t.start + u*t.slope
	}
	c, s, _ := t.at(u)
	return c.t0 + s*(c.t1+s*(c.t2+s*c.t3))
}

// Slope returns the temperature at u and its derivative.
func (t *Table) Slope(u float64) (T, slope float64) {
	if t.straight {
		return t.start + u*t.slope, t.slope
	}
	c, s, inverse := t.at(u)
	return c.t0 + s*(c.t1+s*(c.t2+s*c.t3)), (c.t1 + s*(2*c.t2+s*3*c.t3)) * inverse
}

// potential returns Φ at u.
func (t *Table) potential(u float64) float64 {
	c, s, _ := t.at(u)
	return c.p0 + s*(c.p1+s*(c.p2+s*c.p3))
}

// potentials sets phi[i] = Φ(e[i] perVolume[i]).
func (t *Table) potentials(e, perVolume, phi []float64) {
	n := len(phi)
	e, perVolume = e[:n], perVolume[:n]
	if t.straight {
		for i := range phi {
			phi[i] = e[i] * perVolume[i] * t.rise
		}
		return
	}
	inverse, zero, cubics := t.widest.inverse, t.widest.zero, t.widest.cubics
	if len(cubics) == 0 {
		j := 0
		for i := range phi {
			u := e[i] * perVolume[i]
			c := t.from(&j, u)
			s := (u - c.from) * c.inverse
			phi[i] = c.p0 + s*(c.p1+s*(c.p2+s*c.p3))
		}
		return
	}
	end := float64(len(cubics))
	for i := 0; i < n; i++ {
		for ; i < n; i++ { // the common case of at, in line and without a call
			x := e[i]*perVolume[i]*inverse + zero
			if !(x >= 0 && x < end) {
				break
			}
			j := int(x)
			c, s := &cubics[j], x-float64(j)
			phi[i] = c.p0 + s*(c.p1+s*(c.p2+s*c.p3))
		}
		if i < n {
			phi[i] = t.potential(e[i] * perVolume[i])
		}
	}
}

// slopes sets phi[i] as potentials does, and the derivatives of potential and temperature to e[i].
func (t *Table) slopes(e, perVolume, phi, dphi, dT []float64) {
	n := len(phi)
	e, perVolume, dphi, dT = e[:n], perVolume[:n], dphi[:n], dT[:n]
	if t.straight {
		for i, v := range perVolume {
			phi[i], dphi[i], dT[i] = e[i]*v*t.rise, v*t.rise, v*t.slope
		}
		return
	}
	inverse, zero, cubics := t.widest.inverse, t.widest.zero, t.widest.cubics
	if len(cubics) == 0 {
		j := 0
		for i := range phi {
			v := perVolume[i]
			u := e[i] * v
			c := t.from(&j, u)
			s := (u - c.from) * c.inverse
			v *= c.inverse
			phi[i] = c.p0 + s*(c.p1+s*(c.p2+s*c.p3))
			dphi[i] = (c.p1 + s*(2*c.p2+s*3*c.p3)) * v
			dT[i] = (c.t1 + s*(2*c.t2+s*3*c.t3)) * v
		}
		return
	}
	end := float64(len(cubics))
	for i := 0; i < n; i++ {
		for ; i < n; i++ { // as in potentials
			v := perVolume[i]
			x := e[i]*v*inverse + zero
			if !(x >= 0 && x < end) {
				break
			}
			j := int(x)
			c, s := &cubics[j], x-float64(j)
			v *= inverse
			phi[i] = c.p0 + s*(c.p1+s*(c.p2+s*c.p3))
			dphi[i] = (c.p1 + s*(2*c.p2+s*3*c.p3)) * v
			dT[i] = (c.t1 + s*(2*c.t2+s*3*c.t3)) * v
		}
		if i < n {
			v := perVolume[i]
			c, s, inverse := t.at(e[i] * v)
			v *= inverse
			phi[i] = c.p0 + s*(c.p1+s*(c.p2+s*c.p3))
			dphi[i] = (c.p1 + s*(2*c.p2+s*3*c.p3)) * v
			dT[i] = (c.t1 + s*(2*c.t2+s*3*c.t3)) * v
		}
	}
}
