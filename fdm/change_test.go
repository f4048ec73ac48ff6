package fdm_test

import (
	"errors"
	"math"
	"testing"

	"example.com/coolward/fdm"
	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// What has been hot keeps its new properties: a plate that dries with a peak of its specific heat takes up that heat
// once. Heated and cooled twice, in a thin plate, it exchanges what its enthalpies say.
func TestChangeHappensOnce(t *testing.T) {
	wet := jumping{plain{1000, 1000, 50}} // 29 times as much between 340 K and 345 K
	p := fdm.Problem{
		Body: sheet(0.01), Material: fdm.Changing{Material: wet, At: kelvin(350), Into: plain{1000, 1000, 50}}, Initial: kelvin(300), Cells: 10,
		Horizon: seconds(40000), Surface: boundary.Following(units.WattPerSquareMetreKelvin.Of(50), boundary.Log(
			[]units.Duration{{}, seconds(10000), seconds(10000), seconds(20000), seconds(20000), seconds(30000), seconds(30000), seconds(50000)},
			[]units.Temperature{kelvin(400), kelvin(400), kelvin(300), kelvin(300), kelvin(400), kelvin(400), kelvin(300), kelvin(300)},
		)),
	}
	s := solve(t, p)
	balanced(t, "change", s)
	peak := 1e6 * 0.01 * 29 * (jumpTo - jumpFrom)
	for _, c := range []struct{ time, T, heat float64 }{
		{10000, 400, -peak - 1e6}, {20000, 300, -peak}, {30000, 400, -peak - 1e6}, {40000, 300, -peak},
	} {
		if got := heat(t, s, c.time); !near(got, c.heat, 1e-4*1e6) {
			t.Errorf("heat after %g s: %.8g J, want %.8g J", c.time, got, c.heat)
		}
		for _, place := range []shape.Place{shape.Surface(), shape.Centre(), shape.Mean(), shape.Below(metres(0.0043))} {
			if got := at(t, s, place, c.time); !near(got, c.T, 0.01) {
				t.Errorf("%v after %g s: %.5f K, want %g K", place, c.time, got, c.T)
			}
		}
	}
	// Temperatures are continuous where nodes change.
	last := 300.0
	for time := 0.0; time < 10000; time += 0.5 {
		T := at(t, s, shape.Surface(), time)
		if math.Abs(T-last) > 1 {
			t.Errorf("from %g K to %g K at %g s", last, T, time)
			break
		}
		last = T
	}
}

// A change of the conductivity that passes through a wall leaves the steady state of the resistances in series: what
// has been hotter than the change conducts better.
func TestChangedConductivity(t *testing.T) {
	const k1, k2, hot, cold, change = 0.5, 2.0, 1000.0, 300.0, 600.0
	p := fdm.Problem{
		Body: sheet(0.1), Material: fdm.Changing{Material: plain{2000, 900, k1}, At: kelvin(change), Into: plain{2000, 900, k2}}, Initial: kelvin(300), Cells: 100, Uniform: true,
		Surface: boundary.Temperature(kelvin(hot)), Opposite: boundary.Temperature(kelvin(cold)), Horizon: units.Day.Of(20),
	}
	s := solve(t, p)
	balanced(t, "changed conductivity", s)
	// k2 (hot − change)/x = k1 (change − cold)/(d − x), from a front that only goes on.
	x := 0.1 * k2 * (hot - change) / (k2*(hot-change) + k1*(change-cold))
	for _, c := range []struct{ depth, want float64 }{{0, hot}, {x / 2, (hot + change) / 2}, {(0.1 + x) / 2, (cold + change) / 2}, {0.1, cold}} {
		if got := at(t, s, shape.Below(metres(c.depth)), p.Horizon.SI()); !near(got, c.want, 0.015*(hot-cold)) {
			t.Errorf("%g m below: %.4f K, want %.4f K", c.depth, got, c.want)
		}
	}
}

func TestBadChanges(t *testing.T) {
	one := plain{1000, 1000, 1}
	for name, m := range map[string]fdm.Material{
		"nothing before":  fdm.Changing{At: kelvin(350), Into: one},
		"nothing after":   fdm.Changing{Material: one, At: kelvin(350)},
		"at nothing":      fdm.Changing{Material: one, Into: one},
		"out of range":    fdm.Changing{Material: one, At: kelvin(1300), Into: steel},
		"twice":           fdm.Changing{Material: one, At: kelvin(350), Into: fdm.Changing{Material: one, At: kelvin(360), Into: one}},
		"NaN temperature": fdm.Changing{Material: one, At: kelvin(math.NaN()), Into: one},
	} {
		p := scaled(1, 10)
		p.Material = m
		var a *units.ArgumentError
		var r *units.RangeError
		if _, err := p.Solve(t.Context()); !errors.As(err, &a) && !errors.As(err, &r) {
			t.Errorf("%s: %v", name, err)
		}
	}
}
