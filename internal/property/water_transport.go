package property

import "math"

// Critical point of water, IAPWS R2-83, and the reducing point of the transport equations.
const (
	waterCriticalTemp     = 647.096 // K
	waterCriticalPressure = 22.064e6
	waterCriticalDensity  = 322.0
)

// WaterViscosity returns the viscosity of water or steam at the temperature t and the density rho: IAPWS R12-08, equations
// (10) to (12), without the critical enhancement (µ2 = 1), which the release leaves out for industrial use. Coefficients
// from memory; they reproduce table 4.
func WaterViscosity(t, rho float64) float64 {
	tr, dr := t/waterCriticalTemp, rho/waterCriticalDensity
	r := 1 / tr
	mu0 := 100 * math.Sqrt(tr) / (1.67752 + r*(2.20462+r*(0.6366564+r*-0.241605)))
	x, y := r-1, dr-1
	sum := 0.0
	for i := len(viscosityH) - 1; i >= 0; i-- {
		h := &viscosityH[i]
		sum = sum*x + (h[0] + y*(h[1]+y*(h[2]+y*(h[3]+y*(h[4]+y*(h[5]+y*h[6]))))))
	}
	return 1e-6 * mu0 * math.Exp(dr*sum)
}

// viscosityH is table 2 of IAPWS R12-08, the rows by the power of 1/T, the columns by that of the density.
var viscosityH = [6][7]float64{
	{0.520094, 0.222531, -0.281378, 0.161913, -0.0325372, 0, 0},
	{0.0850895, 0.999115, -0.906851, 0.257399, 0, 0, 0},
	{-1.08374, 1.88797, -0.772479, 0, 0, 0, 0},
	{-0.289555, 1.26613, -0.489837, 0, 0.0698452, 0, -0.00435673},
	{0, 0, -0.25704, 0, 0, 0.00872102, 0},
	{0, 0.120573, 0, 0, 0, 0, -0.000593264},
}

// WaterConductivity returns the thermal conductivity of water or steam at the temperature t and the density rho without the
// critical enhancement: IAPWS R15-11, equations (15) to (17). Coefficients from memory; they reproduce the values of table 4 for which the
// enhancement is nil.
func WaterConductivity(t, rho float64) float64 {
	tr, dr := t/waterCriticalTemp, rho/waterCriticalDensity
	r := 1 / tr
	k0 := math.Sqrt(tr) / (2.443221e-3 + r*(1.323095e-2+r*(6.770357e-3+r*(-3.454586e-3+r*4.096266e-4))))
	x, y := r-1, dr-1
	sum := 0.0
	for i := len(conductivityL) - 1; i >= 0; i-- {
		l := &conductivityL[i]
		sum = sum*x + (l[0] + y*(l[1]+y*(l[2]+y*(l[3]+y*(l[4]+y*l[5])))))
	}
	return 1e-3 * k0 * math.Exp(dr*sum)
}

// conductivityL is table 2 of IAPWS R15-11, the rows by the power of 1/T, the columns by that of the density.
var conductivityL = [5][6]float64{
	{1.60397357, -0.646013523, 0.111443906, 0.102997357, -0.0504123634, 0.00609859258},
	{2.33771842, -2.78843778, 1.53616167, -0.463045512, 0.0832827019, -0.00719201245},
	{2.19650529, -4.54580785, 3.55777244, -1.40944978, 0.275418278, -0.0205938816},
	{-1.21051378, 1.60812989, -0.621178141, 0.0716373224, 0, 0},
	{-2.720337, 4.57586331, -3.18369245, 1.1168348, -0.19268305, 0.012913842},
}

// ConductivityEnhancement returns what the nearness of the critical point adds to [WaterConductivity] in the state g, whose
// viscosity is mu: IAPWS R15-11, equations (18) to (24), with the reference derivative of equation (25) that the release gives for use with
// IAPWS R7-97. Coefficients from memory; they reproduce tables 7 and 8.
func ConductivityEnhancement(g *Gibbs, mu float64) float64 {
	const (
		lambda    = 177.8514
		r         = 461.51805 // J/(kg K), the gas constant of this release
		qD        = 1 / 0.40  // 1/nm
		xi0       = 0.13      // nm
		gamma0    = 0.06
		exponent  = 0.630 / 1.239 // ν/γ
		reference = 1.5           // reduced temperature of referenceZeta
	)
	rho := 1 / g.Volume()
	tr, dr := g.T/waterCriticalTemp, rho/waterCriticalDensity
	zeta := dr * g.Compressibility() * waterCriticalPressure
	chi := dr * (zeta - referenceZeta(dr)*reference/tr)
	if chi <= 0 {
		return 0
	}
	y := qD * xi0 * math.Pow(chi/gamma0, exponent)
	if y < 1.2e-7 {
		return 0
	}
	inv := 1 / g.HeatCapacityRatio()
	z := 2 / (math.Pi * y) * ((1-inv)*math.Atan(y) + inv*y + math.Expm1(-1/(1/y+y*y/(3*dr*dr))))
	return 1e-3 * lambda * dr * (g.HeatCapacity() / r) * tr / (mu * 1e6) * z
}

// referenceZeta is the derivative of the reduced density by the reduced pressure at 1.5 times the critical temperature: IAPWS R15-11, equation
// (25).
func referenceZeta(dr float64) float64 {
	a := &referenceA[0]
	for i, upTo := range referenceDensity {
		if dr > upTo {
			a = &referenceA[i+1]
		}
	}
	return 1 / (a[0] + dr*(a[1]+dr*(a[2]+dr*(a[3]+dr*(a[4]+dr*a[5])))))
}

// referenceDensity and referenceA are table 6 of IAPWS R15-11.
var (
	referenceDensity = [4]float64{0.310559006, 0.776397516, 1.242236025, 1.863354037}
	referenceA       = [5][6]float64{
		{6.53786807199516, -5.61149954923348, 3.39624167361325, -2.27492629730878, 10.2631854662709, 1.97815050331519},
		{6.52717759281799, -6.30816983387575, 8.08379285492595, -9.82240510197603, 12.1358413791395, -5.54349664571295},
		{5.35500529896124, -3.96415689925446, 8.91990208918795, -12.0338729505790, 9.19494865194302, -2.16866274479712},
		{1.55225959906681, 0.464621290821181, 8.93237374861479, -11.0321960061126, 6.16780999933360, -0.965458722086812},
		{1.11999926419994, 0.595748562571649, 9.88952565078920, -10.3255051147040, 4.66861294457414, -0.503243546373828},
	}
)

// WaterSurfaceTension returns the surface tension of water against its vapour at the temperature t, up to the critical
// point: IAPWS R1-76(2014), equation (1). Coefficients from memory.
func WaterSurfaceTension(t float64) float64 {
	tau := 1 - t/waterCriticalTemp
	return 0.2358 * math.Pow(tau, 1.256) * (1 - 0.625*tau)
}
