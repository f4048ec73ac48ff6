package lumped

import (
	"context"
	"encoding/binary"
	"math"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
	"example.com/coolward/units/shape"
)

// bytesLog makes a log of any bytes: eight for a time, eight for a temperature; or, if tame, readings near those of
// a body that cools.
func bytesLog(data []byte, tame bool) Log {
	var l Log
	t := 0.0
	for len(data) >= 16 {
		a, b := math.Float64frombits(binary.LittleEndian.Uint64(data)), math.Float64frombits(binary.LittleEndian.Uint64(data[8:]))
		if tame {
			t += 1 + float64(data[0])
			a, b = t, 280+float64(data[8])/4+80*math.Exp(-t/float64(50+4*int(data[1])))
			if data[9] == 7 {
				b = math.NaN()
			}
		}
		l.Times, l.Temperatures = append(l.Times, seconds(a)), append(l.Temperatures, kelvin(b))
		data = data[16:]
	}
	return l
}

func finite[Q interface{ IsFinite() bool }](t *testing.T, what string, numbers ...Q) {
	t.Helper()
	for _, x := range numbers {
		if !x.IsFinite() {
			t.Errorf("%s: %v beside no error", what, numbers)
		}
	}
}

// Whatever the readings: no panic, and finite numbers beside a nil error.
func FuzzFit(f *testing.F) {
	f.Add([]byte("0123456789abcdefghijklmnopqrstuvwxyz0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789abcdefghijklmnopqrstuvwxyz"), 0.0, 0.0, 300.0, 0, true)
	f.Add(make([]byte, 160), 280.0, 0.0, 300.0, 1, true)
	f.Add(make([]byte, 64), 280.0, 360.0, 280.0, 2, false)
	f.Fuzz(func(t *testing.T, data []byte, ambient, initial, target float64, loss int, tame bool) {
		if len(data) > 16*40 {
			return
		}
		l := bytesLog(data, tame)
		fit := Fit{Log: l, Ambient: kelvin(ambient), Initial: kelvin(initial), Loss: Loss(loss), Capacity: joule(1000), Area: units.SquareMetre.Of(0.1)}
		s, err := fit.Solve(context.Background())
		if (err == nil) == (s == nil) {
			t.Fatalf("%v beside %v", s, err)
		}
		if err != nil {
			return
		}
		if e, err := s.TimeConstant(); err == nil {
			finite(t, "time constant", e.Value, e.StandardError, e.Low, e.High)
		}
		if e, err := s.Coefficient(); err == nil {
			finite(t, "coefficient", e.Value, e.StandardError, e.Low, e.High)
		}
		last := l.Times[len(l.Times)-1]
		for _, ask := range []func() (Estimate[units.Temperature, units.TemperatureDifference], error){
			s.Initial, s.Ambient,
			func() (Estimate[units.Temperature, units.TemperatureDifference], error) { return s.At(last) },
			func() (Estimate[units.Temperature, units.TemperatureDifference], error) { return s.Reading(last) },
		} {
			if e, err := ask(); err == nil {
				finite(t, "temperature", e.Value, e.Low, e.High)
				finite(t, "its error", e.StandardError)
			}
		}
		if e, err := s.TimeTo(kelvin(target)); err == nil {
			finite(t, "time", e.Value, e.StandardError, e.Low, e.High)
			if !e.OpenLow && e.Low.SI() > e.Value.SI()*(1+1e-6)+1e-6 || !e.OpenHigh && e.High.SI() < e.Value.SI()*(1-1e-6)-1e-6 {
				t.Errorf("%v is not in its interval", e)
			}
		}
		if _, err := s.Derivation().MarshalJSON(); err != nil {
			t.Error(err)
		}
		surface := SurfaceFit{Log: l, Capacity: joule(1000), Area: units.SquareMetre.Of(0.1), Ambient: kelvin(ambient), Find: Unknown(loss)}
		if s, err := surface.Solve(context.Background()); err == nil {
			if e, err := s.Emissivity(); err != nil || !isFinite(e.Value+e.StandardError+e.Low+e.High) {
				t.Errorf("emissivity %v, %v", e, err)
			}
			if e, err := s.Coefficient(); err == nil {
				finite(t, "coefficient", e.Value, e.StandardError, e.Low, e.High)
			}
			if _, err := s.Derivation().MarshalJSON(); err != nil {
				t.Error(err)
			}
		}
	})
}

func FuzzSensor(f *testing.F) {
	f.Add([]byte("0123456789abcdefghijklmnopqrstuvwxyz0123456789ABCDEFGHIJKLMNOPQRSTUVWXYZ0123456789abcdefghijklmnopqrstuvwxyz"), 1.0, 1.0, 2.0, 3.0, 10.0, 0.5, true)
	f.Add(make([]byte, 96), 1e-3, 1e3, 1e300, 1e-300, 1e9, 0.999, false)
	f.Fuzz(func(t *testing.T, data []byte, a, b, c, d, width, part float64, tame bool) {
		if len(data) > 16*40 {
			return
		}
		l := bytesLog(data, tame)
		bare, _ := BareSensor(shape.Sphere(units.Metre.Of(a)), units.KilogramPerCubicMetre.Of(b), units.JoulePerKilogramKelvin.Of(c), units.WattPerSquareMetreKelvin.Of(d))
		known, _ := SensorWith(seconds(a))
		sheathed, _ := SheathedSensor(joule(a), conductance(b), joule(c), conductance(d))
		for _, s := range []Sensor{bare, known, sheathed} {
			if got, err := s.ResponseTime(part); err == nil {
				finite(t, "response", got)
			}
			if got, err := s.Indicated(l); err == nil {
				for i, T := range got.Temperatures {
					if !T.IsFinite() && !math.IsNaN(l.Temperatures[i].SI()) {
						t.Errorf("indicated %v", T)
					}
				}
			}
			if got, err := s.Corrected(l, seconds(width)); err == nil {
				for i, T := range got.Log.Temperatures {
					if !T.IsFinite() && !math.IsNaN(l.Temperatures[i].SI()) || !isFinite(got.NoiseGain[i]) {
						t.Errorf("corrected %v, gain %g", T, got.NoiseGain[i])
					}
				}
			}
			if _, err := s.Derivation().MarshalJSON(); err != nil {
				t.Error(err)
			}
		}
	})
}

func FuzzNetwork(f *testing.F) {
	f.Add(1000.0, 300.0, 5.0, 0.5, 363.0, 293.0, 293.0, 0.0, 0.0, 100.0, 300.0, 0)
	f.Add(1e-300, 1e300, 1e-5, 1e5, 1.0, 1e6, 3.0, 1e3, 1e-9, 1e9, 2.0, 1)
	f.Add(1.0, 1.0, 1.0, 1.0, 300.0, 300.0, 300.0, 1.0, 1.0, 50.0, 300.0, 2)
	f.Add(1.0, 1.0, 1.0, 1.0, 300.0, 300.0, 300.0, 1.0, 1.0, 50.0, 310.0, 3)
	f.Fuzz(func(t *testing.T, c1, c2, g, h, a, b, room, power, rate, when, target float64, kind int) {
		n := cup(c1, c2, g, h, a, b, room)
		n.Nodes[0].Power = units.Watt.Of(power)
		n.Horizon = seconds(when)
		ctx, cancel := context.WithCancel(context.Background())
		defer cancel()
		calls := 0
		switch kind {
		case 1:
			n.Surroundings[0].Temperature = boundary.Ramp(kelvin(room), units.KelvinPerSecond.Of(rate))
		case 2:
			if when > 1e4*math.Abs(rate) {
				return // a long time of a fast swing
			}
			n.Surroundings[0].Temperature = boundary.Oscillation(kelvin(room), units.KelvinDifference.Of(power), seconds(rate), seconds(a))
		case 3:
			n.Links = append(n.Links, Link{From: "tea", To: "room", Flow: func(x, y units.Temperature) (units.Power, error) {
				if calls++; calls > 5000 {
					cancel()
				}
				return units.Watt.Of(rate * (math.Pow(x.SI(), 4) - math.Pow(y.SI(), 4))), nil
			}})
		case 4:
			n.Links = n.Links[:1]
		}
		s, _ := n.Solve(ctx)
		if s == nil {
			return
		}
		for _, node := range []string{"tea", "cup"} {
			if T, err := s.At(node, seconds(when/3)); err == nil {
				finite(t, "temperature", T)
			}
			if got, err := s.TimeTo(node, kelvin(target)); err == nil {
				finite(t, "time", got)
			}
			if T, ok := s.Limit(node); ok {
				finite(t, "limit", T)
			}
		}
		if T, err := s.Mean(seconds(when / 2)); err == nil {
			finite(t, "mean", T)
		}
		if q, err := s.HeatReleased(seconds(when / 2)); err == nil {
			finite(t, "heat", q)
		}
		if _, err := s.Derivation().MarshalJSON(); err != nil {
			t.Error(err)
		}
	})
}
