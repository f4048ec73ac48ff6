package property

import (
	"fmt"
	"math"
	"testing"
)

// IAPWS R10-06(2009), table 6, density and specific heat, twelve digits from memory.
func TestIceTable(t *testing.T) {
	for _, c := range []struct{ temp, p, rho, cp float64 }{
		{273.16, 611.657, 916.709492200, 2096.78431622},
		{273.152519, 101325, 916.721463419, 2096.71391024},
		{100, 100e6, 941.678203297, 866.333195517},
	} {
		at := fmt.Sprintf(" of ice at %g K and %g Pa", c.temp, c.p)
		near(t, "density"+at, IceDensity(c.temp, c.p), c.rho, 5.1e-10)
		near(t, "specific heat"+at, IceSpecificHeat(c.temp, c.p), c.cp, 5.1e-9*(c.cp/1000))
	}
}

// The curve is the isobar of 101325 Pa: c = dh/dT, and h is zero at 0 K.
func TestIceCurve(t *testing.T) {
	for temp := 100.0; temp <= 273; temp += 1.7 {
		const d = 0.01
		slope := (Ice{}.Enthalpy(temp+d) - Ice{}.Enthalpy(temp-d)) / (2 * d)
		near(t, fmt.Sprintf("dh/dT of ice at %g K", temp), slope, Ice{}.SpecificHeat(temp), 1e-6*slope)
	}
	near(t, "enthalpy of ice at 1 K", Ice{}.Enthalpy(1), 0, 0.01)
}

// Ice, water and vapour at the triple point: the enthalpies are on one scale. The Clausius-Clapeyron slope of the sublimation line is
// that of the heat of sublimation, 2834.4 kJ/kg by these enthalpies; and the Gibbs energy of the ice would follow. The heat of
// fusion, 333.43 ± 0.2 kJ/kg at 0 °C, is the figure of R. Feistel, W. Wagner, J. Phys. Chem. Ref. Data 35 (2006) 1021, from memory.
func TestTriplePoint(t *testing.T) {
	near(t, "sublimation pressure, saturation pressure", IceSublimation(tripleTemp), WaterSaturation(tripleTemp), 1e-6*triplePressure)
	liquid, vapour := Water97(273.15, 101325), Steam97(tripleTemp, triplePressure)
	near(t, "heat of fusion", liquid.Enthalpy()-IceEnthalpy(273.15), 333.43e3, 200)
	const d = 0.01
	for temp := 223.15; temp < tripleTemp; temp += 5 {
		slope := (IceSublimation(temp+d) - IceSublimation(temp-d)) / (2 * d)
		p := IceSublimation(temp)
		h, _ := IdealSteam(temp)
		volume := SteamR * temp / p
		near(t, fmt.Sprintf("slope of the sublimation pressure at %g K, relative", temp), (h-IceEnthalpy(temp))/(temp*(volume-1/917.0))/slope, 1, 2e-3)
	}
	near(t, "heat of sublimation", vapour.Enthalpy()-IceEnthalpy(tripleTemp), 2834.4e3, 500)
}

// IAPWS R14-08(2011), the check value at 230 K, from memory.
func TestIceSublimation(t *testing.T) {
	near(t, "sublimation pressure at 230 K", IceSublimation(230), 8.94735, 0.51e-5)
	if p := IceSublimation(math.Nextafter(tripleTemp, 0)); math.Abs(p-triplePressure) > 1e-3 {
		t.Errorf("sublimation pressure next to the triple point: %g Pa", p)
	}
}
