package property

import (
	"math"

	"example.com/coolward/internal/root"
)

const (
	vapourMolarMass = 18.015268e-3 // kg/mol, water

	// MolarMassRatio is that of water to dry air.
	MolarMassRatio = vapourMolarMass / airMolarMass
)

// VapourSaturation returns the pressure of vapour above ice below the triple point, and above liquid water from there on.
func VapourSaturation(t float64) float64 {
	if t < tripleTemp {
		return IceSublimation(t)
	}
	return WaterSaturation(t)
}

// DewPoint returns the temperature at which [VapourSaturation] is pv: the dew point, or the frost point below the
// triple point. It reports false for a pv outside the pressures of 50 K and 647.096 K.
func DewPoint(pv float64) (float64, bool) {
	if pv >= triplePressure && pv <= waterCriticalPressure {
		return max(tripleTemp, WaterBoiling(pv)), true
	}
	return root.Find(func(t float64) float64 { return math.Log(IceSublimation(t) / pv) }, 50, tripleTemp, 0)
}

// MoistAir returns density, isobaric specific heat, thermal conductivity and viscosity of air at the temperature t and the
// pressure p in which the vapour has the share x of the moles: an ideal mixture. The viscosity is by the rule of C. R. Wilke, J. Chem. Phys. 18
// (1950) 517–519, and the conductivity by the same weights, as E. A. Mason and S. C. Saxena, Phys. Fluids 1 (1958) 361–369, with their
// factor 1.065 replaced by 1 (B. E. Poling, J. M. Prausnitz, J. P. O'Connell, The Properties of Gases and Liquids, 5th ed., section
// 10-6); all from memory. Without vapour it is [Air] to the last digit.
func MoistAir(t, p, x float64) (rho, cp, k, mu float64) {
	molar := p / (gasConstant * t)
	ka, ma := AirTransport(t, molar)
	ca := AirCp0(t)
	if x == 0 {
		return molar * airMolarMass, ca, ka, ma
	}
	mv, kv := WaterViscosity(t, 0), WaterConductivity(t, 0)
	_, cv := IdealSteam(t)
	y := 1 - x
	a, v := y*airMolarMass, x*vapourMolarMass
	wa := 1 / (y + x*wilke(ma/mv, airMolarMass/vapourMolarMass))
	wv := 1 / (x + y*wilke(mv/ma, vapourMolarMass/airMolarMass))
	return molar * (a + v), (a*ca + v*cv) / (a + v), y*ka*wa + x*kv*wv, y*ma*wa + x*mv*wv
}

// wilke returns the weight φ of the other gas in the sum of one gas, by the ratios one/other of viscosity and molar mass.
func wilke(viscosity, mass float64) float64 {
	s := 1 + math.Sqrt(viscosity/math.Sqrt(mass))
	return s * s / math.Sqrt(8*(1+mass))
}

// DryAirEnthalpy returns the enthalpy of dry air as an ideal gas, zero at 0 °C.
func DryAirEnthalpy(t float64) float64 {
	f := Functions{C: AirCp0}
	return f.gauss(zeroCelsius, t)
}

// MoistAirEnthalpy returns the enthalpy of air with the humidity ratio w, in J per kg of dry air, zero for dry air at 0 °C and
// for liquid water at the triple point.
func MoistAirEnthalpy(t, w float64) float64 {
	h, _ := IdealSteam(t)
	return DryAirEnthalpy(t) + w*h
}

// HumidityRatio returns the mass of vapour per mass of dry air.
func HumidityRatio(p, pv float64) float64 { return MolarMassRatio * pv / (p - pv) }

// condensed returns the enthalpy of the water or ice on the bulb at the pressure p.
func condensed(t, p float64) float64 {
	if t < tripleTemp {
		return IceEnthalpy(t)
	}
	g := Water97(t, max(p, WaterSaturation(t)))
	return g.Enthalpy()
}

// wetBulbExcess is the balance of the adiabatic saturation of air with the enthalpy h and the humidity ratio w to the temperature s, times
// (p − ps) and in J/kg Pa, so that it stays finite where water boils: h + (ws − w) hc(s) − h(s, ws).
func wetBulbExcess(h, w, p, s float64) float64 {
	ps := VapourSaturation(s)
	hc := condensed(s, p)
	hv, _ := IdealSteam(s)
	return (p-ps)*(h-DryAirEnthalpy(s)-w*hc) - MolarMassRatio*ps*(hv-hc)
}

// WetBulb returns the thermodynamic wet-bulb temperature, that of adiabatic saturation, of air at the temperature t and the pressure p with the
// vapour pressure pv. Where both a wet and an iced bulb have one, it is that of the wet bulb. The
// second result is false where there is none.
func WetBulb(t, p, pv float64) (float64, bool) {
	const coldest = 100 // K, far below any wet bulb
	low := float64(coldest)
	if pv > 0 {
		d, ok := DewPoint(pv)
		if !ok {
			return 0, false
		}
		low = max(low, d)
	}
	high := min(t, max(tripleTemp, WaterBoiling(p)))
	w := HumidityRatio(p, pv)
	h := MoistAirEnthalpy(t, w)
	excess := func(s float64) float64 { return wetBulbExcess(h, w, p, s) }
	if low >= high || excess(high) >= 0 {
		return high, true // saturated
	}
	if high >= tripleTemp && (low >= tripleTemp || excess(tripleTemp) >= 0) {
		return root.Find(excess, max(low, tripleTemp), high, 1e-11)
	}
	// One unit below the triple point the bulb is iced.
	return root.Find(excess, low, min(high, math.Nextafter(tripleTemp, 0)), 1e-11)
}

// VapourOfWetBulb returns the vapour pressure of air at the temperature t and the pressure p whose wet-bulb temperature is s. It is the
// balance of [WetBulb], solved for the humidity. It is negative where s is too low to be a wet bulb.
func VapourOfWetBulb(t, p, s float64) float64 {
	ps := VapourSaturation(s)
	hc := condensed(s, p)
	hs, _ := IdealSteam(s)
	ht, _ := IdealSteam(t)
	ws := HumidityRatio(p, ps)
	w := (ws*(hs-hc) - (DryAirEnthalpy(t) - DryAirEnthalpy(s))) / (ht - hc)
	return p * w / (MolarMassRatio + w)
}

// VapourDiffusivity returns the diffusivity of water vapour in air at the temperature t and the pressure p: W. J. Massman, Atmos.
// Environ. 32 (1998) 1111–1127, from memory.
func VapourDiffusivity(t, p float64) float64 {
	return 0.2178e-4 * math.Pow(t/zeroCelsius, 1.81) * (101325 / p)
}

// VapourDensity returns the density of vapour as an ideal gas.
func VapourDensity(t, pv float64) float64 { return pv * vapourMolarMass / (gasConstant * t) }
