package property

import (
	"fmt"
	"math"
	"testing"
	"testing/quick"
)

// The rule of Wilke for three gases: R. B. Bird, W. E. Stewart, E. N. Lightfoot, Transport Phenomena, 2nd ed., example 1.4-2,
// CO2, O2 and N2 at 293 K and 1 atm, from memory: 1.714e-5 Pa s.
func TestWilke(t *testing.T) {
	x := [3]float64{0.133, 0.039, 0.828}
	mu := [3]float64{1.462e-5, 2.031e-5, 1.754e-5}
	mass := [3]float64{44.01, 32.00, 28.02}
	sum := 0.0
	for i := range x {
		d := 0.0
		for j := range x {
			d += x[j] * wilke(mu[i]/mu[j], mass[i]/mass[j])
		}
		sum += x[i] * mu[i] / d
	}
	near(t, "viscosity of CO2, O2 and N2", sum, 1.714e-5, 0.51e-8)
	near(t, "φ of a gas with itself", wilke(1, 1), 1, 1e-15)
}

// Dry moist air is dry air, and pure vapour is vapour.
func TestMoistAirEnds(t *testing.T) {
	for temp := 200.0; temp <= 570; temp += 37 {
		rho, cp, k, mu := MoistAir(temp, 1e5, 0)
		if r, c, l, m := Air(temp, 1e5); r != rho || c != cp || l != k || m != mu {
			t.Errorf("without vapour at %g K: %g, %g, %g, %g; air has %g, %g, %g, %g", temp, rho, cp, k, mu, r, c, l, m)
		}
		rho, cp, k, mu = MoistAir(temp, 1e5, 1)
		_, c := IdealSteam(temp)
		near(t, "density of pure vapour", rho, 1e5/(461.52*temp), 1e-4*rho)
		near(t, "specific heat of pure vapour", cp, c, 1e-12*c)
		near(t, "conductivity of pure vapour", k, WaterConductivity(temp, 0), 1e-12*k)
		near(t, "viscosity of pure vapour", mu, WaterViscosity(temp, 0), 1e-12*mu)
	}
}

// The enthalpy of ASHRAE Fundamentals, chapter 1, from memory: 1.006 t + w (2501 + 1.86 t) in kJ/kg of dry air, t in °C. Its constants
// are rounded, and those of the real gas: 0.25 % in air, 0.03 % of the evaporation and 1.5 % in the vapour.
func TestMoistAirEnthalpy(t *testing.T) {
	for _, w := range []float64{0, 0.005, 0.02, 0.1} {
		for celsius := -20.0; celsius <= 90; celsius += 10 {
			want := 1006*celsius + w*(2501e3+1860*celsius)
			tolerance := 0.0025*1006*math.Abs(celsius) + w*(0.0003*2501e3+0.015*1860*math.Abs(celsius))
			near(t, fmt.Sprintf("enthalpy at %g °C with %g kg/kg", celsius, w), MoistAirEnthalpy(celsius+273.15, w), want, tolerance+1)
		}
	}
}

// The wet bulb of ASHRAE Fundamentals, chapter 1, from memory, above freezing
//
//	w = ((2501 − 2.326 s) ws − 1.006 (t − s))/(2501 + 1.86 t − 4.186 s)
//
// and over ice
//
//	w = ((2830 − 0.24 s) ws − 1.006 (t − s))/(2830 + 1.86 t − 2.1 s)
//
// with ws of the same saturation pressure: 0.2 % of ws, or what the rounded 1.006 makes of the depression.
func TestWetBulbAgainstASHRAE(t *testing.T) {
	const p = 101325
	for _, c := range []struct{ dry, wet float64 }{
		{10, 8},
		{15, 11},
		{20, 15},
		{25, 18},
		{25, 24},
		{30, 22},
		{40, 30},
		{60, 40},
		{90, 50},
		{120, 60},
		{-5, -6},
		{-2, -3},
		{-10, -10.5},
		{5, -1},
		{-20, -20.3},
	} {
		ws := HumidityRatio(p, VapourSaturation(c.wet+273.15))
		w := ((2501-2.326*c.wet)*ws - 1.006*(c.dry-c.wet)) / (2501 + 1.86*c.dry - 4.186*c.wet)
		if c.wet < 0 {
			w = ((2830-0.24*c.wet)*ws - 1.006*(c.dry-c.wet)) / (2830 + 1.86*c.dry - 2.1*c.wet)
		}
		got := HumidityRatio(p, VapourOfWetBulb(c.dry+273.15, p, c.wet+273.15))
		near(t, fmt.Sprintf("humidity ratio at %g °C with a wet bulb of %g °C", c.dry, c.wet), got, w, 0.002*ws+0.003*1.006*(c.dry-c.wet)/2501)
	}
}

// The wet bulb of a humidity, and the humidity of that wet bulb, to 1e-9 K; and it lies between dew point and temperature.
func TestWetBulbRoundTrip(t *testing.T) {
	round := func(x, y, z float64) bool {
		temp, p := 230+340*fraction(x), 50e3+150e3*fraction(y)
		pv := fraction(z) * min(VapourSaturation(temp), p/2)
		s, ok := WetBulb(temp, p, pv)
		if !ok || s > temp {
			t.Errorf("%g K, %g Pa, %g Pa: wet bulb %g K, %v", temp, p, pv, s, ok)
			return false
		}
		if d, ok := DewPoint(pv); pv > 0 && (!ok || d > s+1e-9) {
			t.Errorf("%g K, %g Pa, %g Pa: wet bulb %.12g K, dew point %.12g K, %v", temp, p, pv, s, d, ok)
			return false
		}
		// The slope of the saturation pressure turns 1e-9 K into pascals: below p/K everywhere here.
		slope := (VapourSaturation(s+1e-3) - VapourSaturation(s-1e-3)) / 2e-3
		back := VapourOfWetBulb(temp, p, s)
		if math.Abs(back-pv) > 1e-9*(2*slope+p/500)+1e-12*p {
			t.Errorf("%g K, %g Pa: vapour pressure %.12g Pa, wet bulb %.12g K, back %.12g Pa", temp, p, pv, s, back)
			return false
		}
		return true
	}
	if err := quick.Check(round, &quick.Config{MaxCount: 2000}); err != nil {
		t.Error(err)
	}
}

// Near 0 °C a bulb can stay wet above freezing or iced below: the wet one is taken.
func TestWetBulbNearFreezing(t *testing.T) {
	const temp, p = 278.15, 101325
	wet := VapourOfWetBulb(temp, p, tripleTemp)
	iced := VapourOfWetBulb(temp, p, math.Nextafter(tripleTemp, 0))
	if !(wet < iced) {
		t.Fatalf("vapour pressure %g Pa with a wet bulb at the triple point, %g Pa with an iced one", wet, iced)
	}
	for i := 1; i < 10; i++ {
		pv := wet + (iced-wet)*float64(i)/10
		if s, ok := WetBulb(temp, p, pv); !ok || s < tripleTemp {
			t.Errorf("%g Pa: wet bulb %g K, %v", pv, s, ok)
		}
	}
	if s, ok := WetBulb(temp, p, wet*0.99); !ok || s >= tripleTemp {
		t.Errorf("below: wet bulb %g K, %v", s, ok)
	}
}

// The dew point undoes the saturation pressure, over water and ice.
func TestDewPoint(t *testing.T) {
	for temp := 60.0; temp < 640; temp += 7.3 {
		d, ok := DewPoint(VapourSaturation(temp))
		if !ok {
			t.Errorf("no dew point of the saturation at %g K", temp)
		}
		near(t, "dew point of the saturation", d, temp, 1e-9)
	}
	for _, pv := range []float64{0, -1, 1e9, math.NaN()} {
		if d, ok := DewPoint(pv); ok {
			t.Errorf("dew point of %g Pa: %g K", pv, d)
		}
	}
}

func BenchmarkWetBulb(b *testing.B) {
	b.ReportAllocs()
	for i := 0; b.Loop(); i++ {
		if _, ok := WetBulb(298.15+float64(i&15), 101325, 1584.9); !ok {
			b.Fatal("no wet bulb")
		}
	}
}
