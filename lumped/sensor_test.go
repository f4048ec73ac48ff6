package lumped

import (
	"errors"
	"math"
	"math/rand"
	"testing"

	"example.com/coolward/units"
	"example.com/coolward/units/boundary"
)

func sensorWith(t testing.TB, tau float64) Sensor {
	t.Helper()
	s, err := SensorWith(seconds(tau))
	if err != nil {
		t.Fatal(err)
	}
	return s
}

func sheathed(t testing.TB, element, contact, sheath, film float64) Sensor {
	t.Helper()
	s, err := SheathedSensor(joule(element), conductance(contact), joule(sheath), conductance(film))
	if err != nil {
		t.Fatal(err)
	}
	return s
}

// The bead of a thermocouple that shows 99 % of a step after 10 s: Y. A. Cengel, Heat Transfer, Ex. 4-1 (answer seen
// in a companion to the book), to the second as printed. The book finds the length V/A = D/6.
func TestPublishedResponse(t *testing.T) {
	s, err := BareSensor(sphere(0.001), units.KilogramPerCubicMetre.Of(8500), units.JoulePerKilogramKelvin.Of(320), units.WattPerSquareMetreKelvin.Of(210))
	if err != nil {
		t.Fatal(err)
	}
	got, err := s.ResponseTime(0.99)
	if err != nil {
		t.Fatal(err)
	}
	within(t, "99 %", got.SI(), 10, 0.5)
	within(t, "time constant", s.TimeConstants()[0].SI(), 8500*320*0.001/6/210, 1e-12)
}

// 63.2 % after one time constant, 90 % after 2.303: 1 − 1/e and ln 10.
func TestResponseTimes(t *testing.T) {
	s := sensorWith(t, 7)
	for _, c := range []struct{ part, want float64 }{{-math.Expm1(-1), 7}, {0.9, 7 * math.Ln10}, {0.5, 7 * math.Ln2}} {
		got, err := s.ResponseTime(c.part)
		if err != nil {
			t.Fatal(err)
		}
		within(t, "response", got.SI(), c.want, 1e-12)
	}
	// In a sheath, two time constants: 1 − (τ1 e^(−t/τ1) − τ2 e^(−t/τ2))/(τ1 − τ2), from the theory of two
	// first-order elements in a row, which the poles of the pair are like.
	for _, x := range [][4]float64{{2, 0.5, 10, 0.4}, {1, 1, 1, 1}, {1e-3, 10, 100, 0.1}} {
		s := sheathed(t, x[0], x[1], x[2], x[3])
		tau := s.TimeConstants()
		a, b := tau[0].SI(), tau[1].SI()
		within(t, "sum", a+b, x[0]/x[1]+x[0]/x[3]+x[2]/x[3], 1e-12*(a+b))
		within(t, "product", a*b, x[0]*x[2]/x[1]/x[3], 1e-12*a*b)
		for _, part := range []float64{0.1, 0.632, 0.9, 0.99} {
			got, err := s.ResponseTime(part)
			if err != nil {
				t.Fatal(err)
			}
			at := got.SI()
			within(t, "part shown", 1-(a*math.Exp(-at/a)-b*math.Exp(-at/b))/(a-b), part, 1e-10)
		}
	}
}

// Behind a ramp for long a sensor is late by the sum of its time constants.
func TestLagBehindRamp(t *testing.T) {
	for _, s := range []Sensor{sensorWith(t, 30), sheathed(t, 2, 0.5, 10, 0.4)} {
		lag := s.Lag().SI()
		f, err := s.Follow(boundary.Ramp(kelvin(300), units.KelvinPerSecond.Of(0.1)), kelvin(300), seconds(40*lag))
		if err != nil {
			t.Fatal(err)
		}
		within(t, "shown", nodeAt(t, f, Element, 40*lag), 300+0.1*(40*lag-lag), 1e-9)
	}
}

// What a sensor shows of a log of a ramp is what it shows of the ramp, also with readings missing.
func TestIndicatedLog(t *testing.T) {
	s := sheathed(t, 2, 0.5, 10, 0.4)
	truth := logOf([]float64{100, 103, 110, 140, 141, 200}, func(x float64) float64 { return 300 + 0.2*(x-100) })
	truth.Temperatures[2] = kelvin(math.NaN())
	shown, err := s.Indicated(truth)
	if err != nil {
		t.Fatal(err)
	}
	f, err := s.Follow(boundary.Ramp(kelvin(300), units.KelvinPerSecond.Of(0.2)), kelvin(300), seconds(100))
	if err != nil {
		t.Fatal(err)
	}
	for i, at := range shown.Times {
		if i == 2 {
			if !math.IsNaN(shown.Temperatures[i].SI()) {
				t.Error("a missing reading was made up")
			}
			continue
		}
		within(t, "shown", shown.Temperatures[i].SI(), nodeAt(t, f, Element, at.SI()-100), 1e-9)
	}
	if one, err := s.Indicated(logOf([]float64{3}, func(float64) float64 { return 300 })); err != nil || one.Temperatures[0] != kelvin(300) {
		t.Errorf("one reading: %v, %v", one, err)
	}
}

// A parabola is corrected exactly, for unequal times, ends of the log and any width: the sensor shows
// u − τ u' + (τ² terms) after long times, of which the inverse is T + Στ T' + Πτ T”.
func TestCorrectionOfParabolaIsExact(t *testing.T) {
	r := rand.New(rand.NewSource(1))
	for _, s := range []Sensor{sensorWith(t, 20), sheathed(t, 2, 0.5, 10, 0.4)} {
		sum, product := s.lags()
		times := []float64{-50}
		for range 40 {
			times = append(times, times[len(times)-1]+1+9*r.Float64())
		}
		truth := func(x float64) float64 { return 300 + 0.3*x - 0.002*x*x }
		// With u quadratic: T = u − Στ u' + (Στ² − Πτ) u”.
		shown := logOf(times, func(x float64) float64 {
			return truth(x) - sum*(0.3-0.004*x) + (sum*sum-product)*(-0.004)
		})
		shown.Temperatures[5] = kelvin(math.NaN())
		for _, width := range []float64{0, 15, 60, 1e4} {
			got, err := s.Corrected(shown, seconds(width))
			if err != nil {
				t.Fatal(err)
			}
			for i, at := range times {
				if i == 5 {
					if !math.IsNaN(got.Log.Temperatures[i].SI()) || got.NoiseGain[i] != 0 {
						t.Error("a missing reading was made up")
					}
					continue
				}
				within(t, "corrected", got.Log.Temperatures[i].SI(), truth(at), 1e-7)
			}
		}
	}
}

// The noise gain against the scatter of a corrected log of noise alone, and, for three equal steps without
// smoothing, √(1 + τ²/(2 Δt²)) by the central difference.
func TestNoiseGain(t *testing.T) {
	s := sensorWith(t, 20)
	times := every(2, 41)
	r := rand.New(rand.NewSource(2))
	const trials = 1000
	var squares [41]float64
	var gain []float64
	for range trials {
		shown := logOf(times, func(float64) float64 { return 300 + 0.1*r.NormFloat64() })
		c, err := s.Corrected(shown, seconds(20))
		if err != nil {
			t.Fatal(err)
		}
		gain = c.NoiseGain
		for i, T := range c.Log.Temperatures {
			squares[i] += math.Pow((T.SI()-300)/0.1, 2)
		}
	}
	for _, i := range []int{0, 1, 5, 20, 40} {
		got := math.Sqrt(squares[i] / trials)
		within(t, "gain over scatter", gain[i]/got, 1, 4/math.Sqrt(2*trials))
	}
	c, err := s.Corrected(logOf(times, func(float64) float64 { return 300 }), seconds(0))
	if err != nil {
		t.Fatal(err)
	}
	within(t, "central difference", c.NoiseGain[20], math.Sqrt(1+400.0/8), 1e-9)
	if c.NoiseGain[20] <= gain[20] {
		t.Error("smoothing does not make the noise less")
	}
}

func TestSensorRefusals(t *testing.T) {
	s := sensorWith(t, 5)
	density, heat, h := units.KilogramPerCubicMetre.Of(8500), units.JoulePerKilogramKelvin.Of(320), units.WattPerSquareMetreKelvin.Of(210)
	log := logOf([]float64{0, 1, 2}, func(x float64) float64 { return 300 + x })
	cold := logOf([]float64{0, 1, 2}, func(x float64) float64 { return 300 - 290*x/2 })
	for name, err := range map[string]error{
		"time constant 0":       second(SensorWith(seconds(0))),
		"no time constant":      second(SensorWith(seconds(math.NaN()))),
		"no body":               second(BareSensor(sphere(0), density, heat, h)),
		"no density":            second(BareSensor(sphere(1), units.Density{}, heat, h)),
		"no specific heat":      second(BareSensor(sphere(1), density, units.SpecificHeat{}, h)),
		"no coefficient":        second(BareSensor(sphere(1), density, heat, units.HeatTransferCoefficient{})),
		"no element":            second(SheathedSensor(joule(0), conductance(1), joule(1), conductance(1))),
		"no contact":            second(SheathedSensor(joule(1), conductance(0), joule(1), conductance(1))),
		"no sheath":             second(SheathedSensor(joule(1), conductance(1), joule(0), conductance(1))),
		"no film":               second(SheathedSensor(joule(1), conductance(1), joule(1), conductance(-1))),
		"no finite lag":         second(SheathedSensor(joule(1e300), conductance(1e-300), joule(1), conductance(1))),
		"zero sensor":           second(Sensor{}.ResponseTime(0.5)),
		"zero sensor follows":   second(Sensor{}.Follow(boundary.Steady(kelvin(300)), kelvin(300), seconds(1))),
		"zero sensor indicates": second(Sensor{}.Indicated(log)),
		"zero sensor corrects":  second(Sensor{}.Corrected(log, seconds(0))),
		"part 0":                second(s.ResponseTime(0)),
		"part 1":                second(s.ResponseTime(1)),
		"part NaN":              second(s.ResponseTime(math.NaN())),
		"empty log":             second(s.Indicated(Log{})),
		"two readings":          second(s.Corrected(logOf([]float64{0, 1}, func(float64) float64 { return 300 }), seconds(0))),
		"negative width":        second(s.Corrected(log, seconds(-1))),
		"corrected below 0 K":   second(s.Corrected(cold, seconds(0))),
		"no course":             second(s.Follow(boundary.Course{}, kelvin(300), seconds(1))),
	} {
		var a *units.ArgumentError
		if !errors.As(err, &a) {
			t.Errorf("%s: %v", name, err)
		}
	}
	if (Sensor{}).TimeConstants() != nil || (Sensor{}).Lag().SI() != 0 || len((Sensor{}).Derivation().Lines) != 0 {
		t.Error("the zero sensor answers")
	}
	for _, s := range []Sensor{s, sheathed(t, 2, 0.5, 10, 0.4)} {
		if len(s.Derivation().Lines) == 0 {
			t.Error("no derivation")
		}
	}
}

// A log as the ambient of a body: from its first reading on, straight over a gap, held after the last.
func TestLogAsAmbient(t *testing.T) {
	l := Log{
		Times:        []units.Duration{seconds(1000), seconds(1010), seconds(1020), seconds(1040)},
		Temperatures: []units.Temperature{kelvin(math.NaN()), kelvin(300), kelvin(math.NaN()), kelvin(330)},
	}
	for at, want := range map[float64]float64{0: 300, 10: 310, 30: 330, 99: 330} {
		got, err := l.Course().At(seconds(at))
		if err != nil {
			t.Fatal(err)
		}
		within(t, "ambient", got.SI(), want, 1e-9)
	}
	if err := (Log{}).Course().Check(); err == nil {
		t.Error("an empty log gives a course")
	}
}
