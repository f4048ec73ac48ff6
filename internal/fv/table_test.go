package fv

import (
	"errors"
	"math"
	"testing"
)

// potential is Φ(u), read as the system does.
func (t *Table) phiAt(u float64) float64 {
	phi := make([]float64, 1)
	t.potentials([]float64{u}, []float64{1}, phi)
	return phi[0]
}

// Constant properties: T = T0 + u/(ρc) and Φ = k (T − T0) to rounding, also beyond the ends.
func TestConstantIsExact(t *testing.T) {
	const density, c, k, start = 7850, 460, 45, 350.0
	for _, start := range []float64{300, 350, 400} { // within the range and at its ends
		tb, err := NewTable(constant(density, c, k), start, 300, 400, nil, 1e-6)
		if err != nil {
			t.Fatal(err)
		}
		for T := 290.0; T <= 410; T += 0.37 {
			u := density * c * (T - start)
			if got := tb.Temperature(u); math.Abs(got-T) > 1e-12*T {
				t.Errorf("start %g: T = %.15g, want %.15g to 1e-12", start, got, T)
			}
			if got, want := tb.phiAt(u), k*(T-start); math.Abs(got-want) > 1e-12*k*T {
				t.Errorf("start %g: Φ = %.15g, want %.15g to 1e-12 of k T", start, got, want)
			}
			if _, slope := tb.Slope(u); math.Abs(slope*density*c-1) > 1e-11 {
				t.Errorf("start %g: dT/du = %.15g, want %.15g", start, slope, 1.0/(density*c))
			}
		}
		if !tb.Constant() {
			t.Errorf("start %g: not recognised as constant", start)
		}
		if got := tb.Temperature(0); got != start {
			t.Errorf("T(0) = %.17g, want the start %g to the last bit", got, start)
		}
	}
}

// Linear properties, against the closed forms of enthalpy, its inverse and ∫k dT.
func TestLinearAgainstClosedForm(t *testing.T) {
	m := linear{density: 7850, c0: 400, b: 1e-3, k0: 60, a: -4e-4}
	const start, low, high = 900.0, 280.0, 1200.0
	for _, bound := range []float64{1e-3, 1e-5, 1e-8} {
		tb, err := NewTable(m.material(), start, low, high, nil, bound)
		if err != nil {
			t.Fatal(err)
		}
		if tb.Constant() {
			t.Error("recognised as constant")
		}
		last, lastPhi := 0.0, math.Inf(-1)
		for T := low; T <= high; T += 0.173 {
			u := m.density * (m.enthalpy(T) - m.enthalpy(start))
			// The bound was kept with half the intervals.
			if got := tb.Temperature(u); math.Abs(got-T) > bound {
				t.Errorf("bound %g: T = %.12g, want %.12g", bound, got, T)
			}
			k := m.k0 * (1 + m.a*T)
			got, want := tb.phiAt(u), m.potential(T)-m.potential(start)
			if math.Abs(got-want) > bound*k+1e-9 {
				t.Errorf("bound %g: Φ = %.12g, want %.12g at %g K", bound, got, want, T)
			}
			if now := tb.Temperature(u); now <= last || got <= lastPhi {
				t.Errorf("bound %g: T or Φ does not rise at %g K", bound, T)
			}
			last, lastPhi = tb.Temperature(u), got
		}
	}
}

// The slopes are the derivatives of the cubics: central differences agree with their own error.
func TestSlopes(t *testing.T) {
	m := linear{density: 7850, c0: 400, b: 1e-3, k0: 60, a: -4e-4}
	tb, err := NewTable(m.material(), 900, 280, 1200, nil, 1e-6)
	if err != nil {
		t.Fatal(err)
	}
	var phi, dphi, dT [1]float64
	for u := 1.1 * tb.lowU; u < 1.1*tb.highU; u += 1.23e7 { // 10 % beyond either end
		const d = 1e3
		tb.slopes([]float64{u}, []float64{1}, phi[:], dphi[:], dT[:])
		if phi[0] != tb.phiAt(u) {
			t.Errorf("Φ of slopes %g, of potentials %g", phi[0], tb.phiAt(u))
		}
		if want := (tb.phiAt(u+d) - tb.potential(u-d)) / (2 * d); math.Abs(dphi[0]-want) > 1e-6*want {
			t.Errorf("dΦ/du = %g, want the difference %g to 1e-6", dphi[0], want)
		}
		if want := (tb.Temperature(u+d) - tb.Temperature(u-d)) / (2 * d); math.Abs(dT[0]-want) > 1e-6*want {
			t.Errorf("dT/du = %g, want the difference %g to 1e-6", dT[0], want)
		}
	}
}

// A jump of the specific heat at a kink is met by a node: no error remains beside it.
func TestKink(t *testing.T) {
	tb, err := NewTable(stepped(500, 400, 900, 30, 0.01), 600, 300, 700, []float64{500}, 1e-7)
	if err != nil {
		t.Fatal(err)
	}
	for T := 300.0; T <= 700; T += 0.0917 {
		h := 400*min(T-500, 0) + 900*max(T-500, 0) - 900*100
		if got := tb.Temperature(1000 * h); math.Abs(got-T) > 1e-7 {
			t.Errorf("T = %.12g, want %.12g to 1e-7", got, T)
		}
	}
	if tb.Size() > 200 {
		t.Errorf("%d intervals; the kink was not met by a node", tb.Size())
	}
}

func TestBadProperties(t *testing.T) {
	good := constant(1000, 500, 10)
	with := func(change func(m *Material)) Material {
		m := good
		change(&m)
		return m
	}
	returns := func(v float64, err error) func(float64) (float64, error) {
		return func(float64) (float64, error) { return v, err }
	}
	for _, c := range []struct {
		name     string
		m        Material
		property string
	}{
		{"no conductivity", with(func(m *Material) { m.Conductivity = returns(0, nil) }), "conductivity"},
		{"negative specific heat", with(func(m *Material) { m.SpecificHeat = returns(-1, nil) }), "specific heat"},
		{"NaN conductivity within", with(func(m *Material) {
			m.Conductivity = func(T float64) (float64, error) {
				if T > 349 && T < 351 {
					return math.NaN(), nil
				}
				return 10, nil
			}
		}), "conductivity"},
		{"infinite enthalpy", with(func(m *Material) { m.Enthalpy = returns(math.Inf(1), nil) }), "enthalpy"},
		{"falling enthalpy", with(func(m *Material) { m.Enthalpy = func(T float64) (float64, error) { return -T, nil } }), "enthalpy"},
		{"not the derivative of the enthalpy", with(func(m *Material) { m.SpecificHeat = returns(550, nil) }), "specific heat"},
		{"inverse elsewhere", with(func(m *Material) { m.Temperature = returns(5000, nil) }), "temperature"},
		{"NaN inverse", with(func(m *Material) { m.Temperature = returns(math.NaN(), nil) }), "temperature"},
	} {
		_, err := NewTable(c.m, 350, 300, 400, nil, 1e-6)
		var p *PropertyError
		if !errors.As(err, &p) || p.Property != c.property {
			t.Errorf("%s: %v, want a PropertyError of %s", c.name, err, c.property)
		}
	}
	for _, m := range []Material{
		with(func(m *Material) { m.Conductivity = returns(1, errOwn) }),
		with(func(m *Material) { m.SpecificHeat = returns(1, errOwn) }),
		with(func(m *Material) { m.Enthalpy = returns(1, errOwn) }),
		with(func(m *Material) { m.Temperature = returns(1, errOwn) }),
	} {
		if _, err := NewTable(m, 350, 300, 400, nil, 1e-6); !errors.Is(err, errOwn) {
			t.Errorf("%v, want the error of the material", err)
		}
	}
	if _, err := NewTable(good, 350, 300, 400, []float64{380, 320}, 1e-6); err == nil {
		t.Error("kinks out of order: no error")
	}
	// A kink that was not declared.
	_, err := NewTable(stepped(351.7, 400, 900, 30, 0), 350, 300, 400, nil, 1e-6)
	var p *PropertyError
	if !errors.As(err, &p) || p.Property != "specific heat" || math.Abs(p.Temperature-351.7) > 0.1 {
		t.Errorf("kink not declared: %v, want a PropertyError of the specific heat at 351.7 K", err)
	}
}
