package property

import "math"

// idealGas is a gas at low pressure: the specific heat of B. J. McBride, M. J. Zehe, S. Gordon, NASA/TP-2002-211556, and, where
// no equation of E. W. Lemmon and R. T. Jacobsen (2004) is at hand, the transport properties of R. A. Svehla, NASA TM 4647
// (1995). Coefficients from memory.
type idealGas struct {
	molarMass float64       // kg/mol
	cp        [2][7]float64 // a₁ to a₇ of cp/R = a₁/T² + a₂/T + a₃ + a₄ T + a₅ T² + a₆ T³ + a₇ T⁴, below and above 1000 K
	fit       *svehla
	dense     *lemmonJacobsen // used instead of fit
}

// svehla holds A, B, C and D of ln y = A ln T + B/T + C/T² + D for the viscosity in µP and the
// conductivity in µW/(cm K), below and above a temperature.
type svehla struct {
	change     float64 // K
	visc, cond [2][4]float64
}

const nasaR = lemmonR // J/(mol K), the gas constant of the fits

// specificHeat returns the isobaric specific heat in J/(kg K), 200 K to 6000 K.
func (g *idealGas) specificHeat(t float64) float64 {
	a := &g.cp[0]
	if t > 1000 {
		a = &g.cp[1]
	}
	r := 1 / t
	return nasaR / g.molarMass * (r*(r*a[0]+a[1]) + a[2] + t*(a[3]+t*(a[4]+t*(a[5]+t*a[6]))))
}

// dilute returns conductivity and viscosity at low pressure.
func (g *idealGas) dilute(t float64) (k, mu float64) {
	if g.dense != nil {
		return g.dense.dilute(math.Log(t))
	}
	return g.fit.at(t)
}

func (s *svehla) at(t float64) (k, mu float64) {
	i := 0
	if t > s.change {
		i = 1
	}
	r, l := 1/t, math.Log(t)
	v, c := &s.visc[i], &s.cond[i]
	mu = math.Exp(v[0]*l + r*(v[1]+r*v[2]) + v[3])
	k = math.Exp(c[0]*l + r*(c[1]+r*c[2]) + c[3])
	return k * 1e-4, mu * 1e-7
}

var nitrogen = idealGas{
	molarMass: 0.0280134,
	cp: [2][7]float64{
		{22103.71497, -381.846182, 6.08273836, -0.00853091441, 1.384646189e-05, -9.62579362e-09, 2.519705809e-12},
		{587712.406, -2239.249073, 6.06694922, -0.00061396855, 1.491806679e-07, -1.923105485e-11, 1.061954386e-15},
	},
	dense: &nitrogenTransport,
}

var oxygen = idealGas{
	molarMass: 0.0319988,
	cp: [2][7]float64{
		{-34255.6342, 484.700097, 1.119010961, 0.00429388924, -6.83630052e-07, -2.0233727e-09, 1.039040018e-12},
		{-1037939.022, 2344.830282, 1.819732036, 0.001267847582, -2.188067988e-07, 2.053719572e-11, -8.19346705e-16},
	},
	dense: &oxygenTransport,
}

var argon = idealGas{
	molarMass: 0.039948,
	cp: [2][7]float64{
		{0, 0, 2.5, 0, 0, 0, 0},
		{20.10538475, -0.0599266107, 2.500069401, -3.99214116e-08, 1.20527214e-11, -1.819015576e-15, 1.078576636e-19},
	},
	dense: &argonTransport,
}

var carbonDioxide = idealGas{
	molarMass: 0.0440095,
	cp: [2][7]float64{
		{49436.5054, -626.411601, 5.30172524, 0.002503813816, -2.127308728e-07, -7.68998878e-10, 2.849677801e-13},
		{117696.2419, -1788.791477, 8.29152319, -9.22315678e-05, 4.86367688e-09, -1.891053312e-12, 6.33003659e-16},
	},
	fit: &svehla{
		change: 1000,
		visc: [2][4]float64{
			{0.51137258, -229.51321, 13710.678, 2.7075538},
			{0.63978285, -42.637076, -15522.605, 1.6628843},
		},
		cond: [2][4]float64{
			{0.48056568, -507.8672, 35088.811, 3.6747794},
			{0.69857277, -118.30477, -50688.859, 1.8650551},
		},
	},
}

var hydrogen = idealGas{
	molarMass: 0.00201588,
	cp: [2][7]float64{
		{40783.2321, -800.918604, 8.21470201, -0.01269714457, 1.753605076e-05, -1.20286027e-08, 3.36809349e-12},
		{560812.801, -837.150474, 2.975364532, 0.001252249124, -3.74071619e-07, 5.9366252e-11, -3.6069941e-15},
	},
	fit: &svehla{
		change: 1000,
		visc: [2][4]float64{
			{0.74553182, 43.555109, -3257.934, 0.13556243},
			{0.96730605, 679.31897, -210251.79, -1.8251697},
		},
		cond: [2][4]float64{
			{1.0059461, 279.51262, -29792.018, 1.1996252},
			{1.058245, 248.75372, 11736.907, 0.82758695},
		},
	},
}

var helium = idealGas{
	molarMass: 0.004002602,
	cp: [2][7]float64{
		{0, 0, 2.5, 0, 0, 0, 0},
		{0, 0, 2.5, 0, 0, 0, 0},
	},
	fit: &svehla{
		change: 1000,
		visc: [2][4]float64{
			{0.75015944, 35.763243, -2212.1291, 0.92126352},
			{0.83394166, 220.82656, -52852.591, 0.20809361},
		},
		cond: [2][4]float64{
			{0.75007833, 36.577987, -2363.66, 2.9766475},
			{0.83319259, 221.57417, -53304.53, 2.2684592},
		},
	},
}

var diluteSteam = idealGas{
	molarMass: 0.01801528,
	cp: [2][7]float64{
		{-39479.6083, 575.573102, 0.931782653, 0.00722271286, -7.34255737e-06, 4.95504349e-09, -1.336933246e-12},
		{1034972.096, -2412.698562, 4.64611078, 0.002291998307, -6.83683048e-07, 9.42646893e-11, -4.82238053e-15},
	},
	fit: &svehla{
		change: 1073.2,
		visc: [2][4]float64{
			{0.50019557, -697.12796, 88163.892, 3.0836508},
			{0.58988538, -537.69814, 54263.513, 2.3386375},
		},
		cond: [2][4]float64{
			{1.0966389, -555.13429, 106234.08, -0.2466455},
			{0.39367933, -2252.4226, 612174.58, 5.8011317},
		},
	},
}

// Gas is a pure gas at low pressure.
type Gas struct{ g *idealGas }

// Nitrogen returns the gas.
func Nitrogen() Gas { return Gas{&nitrogen} }

// Oxygen returns the gas.
func Oxygen() Gas { return Gas{&oxygen} }

// Argon returns the gas.
func Argon() Gas { return Gas{&argon} }

// CarbonDioxide returns the gas.
func CarbonDioxide() Gas { return Gas{&carbonDioxide} }

// Hydrogen returns the gas, normal hydrogen.
func Hydrogen() Gas { return Gas{&hydrogen} }

// Helium returns the gas.
func Helium() Gas { return Gas{&helium} }

// At returns density, isobaric specific heat, thermal conductivity and viscosity at the temperature t and the pressure p.
func (x Gas) At(t, p float64) (rho, cp, k, mu float64) {
	molar := p / (gasConstant * t)
	g := x.g
	if g.dense != nil {
		k, mu = g.dense.at(t, molar)
	} else {
		k, mu = g.fit.at(t)
	}
	return molar * g.molarMass, g.specificHeat(t), k, mu
}
