package property

import "math"

// lemmonJacobsen is the equation of E. W. Lemmon, R. T. Jacobsen, Int. J. Thermophys. 25 (2004) 21–69, for viscosity and
// thermal conductivity, without the critical enhancement of the conductivity, which is nil in a gas near atmospheric
// pressure. Coefficients from memory. Air, which is needed most, has it written out in [AirTransport].
type lemmonJacobsen struct {
	lnTc, lnEpsilon float64 // ln of the critical temperature and of ε/k in K
	rc              float64 // critical density, mol/m³
	dilution        float64 // 0.0266958 √M/σ² in µPa s/√K, M in g/mol, σ in nm
	k1              float64
	k2, k3          struct{ n, t float64 }
	visc, cond      []residualTerm
}

// residualTerm is N τᵗ δᵈ exp(−δˡ), without the exponential where l is 0.
type residualTerm struct {
	n, t float64
	d, l int
}

// dilute returns conductivity and viscosity at zero density.
func (f *lemmonJacobsen) dilute(lnT float64) (k, mu float64) {
	x := lnT - f.lnEpsilon
	eta := f.dilution * math.Exp(0.5*lnT-(0.431+x*(-0.4623+x*(0.08406+x*(0.005341+x*-0.00331)))))
	lnTau := f.lnTc - lnT
	k = f.k1*eta + f.k2.n*math.Exp(f.k2.t*lnTau) + f.k3.n*math.Exp(f.k3.t*lnTau)
	return k * 1e-3, eta * 1e-6
}

// at returns conductivity and viscosity at the temperature t and the molar density rho.
func (f *lemmonJacobsen) at(t, rho float64) (k, mu float64) {
	lnT := math.Log(t)
	k, mu = f.dilute(lnT)
	lnTau, d := f.lnTc-lnT, rho/f.rc
	return k + 1e-3*residual(f.cond, lnTau, d), mu + 1e-6*residual(f.visc, lnTau, d)
}

func residual(terms []residualTerm, lnTau, d float64) (sum float64) {
	for i := range terms {
		r := &terms[i]
		y := power(d, r.d)
		if y < 1e-15 { // below rounding in a thin gas
			continue
		}
		x := r.t * lnTau
		if r.l > 0 {
			x -= power(d, r.l)
		}
		sum += r.n * y * math.Exp(x)
	}
	return sum
}

// power returns xⁿ for n ≥ 0.
func power(x float64, n int) float64 {
	y := 1.0
	for ; n > 0; n >>= 1 {
		if n&1 != 0 {
			y *= x
		}
		x *= x
	}
	return y
}

var nitrogenTransport = lemmonJacobsen{
	lnTc: math.Log(126.192), lnEpsilon: math.Log(98.94), rc: 11183.9,
	dilution: 0.0266958 * math.Sqrt(28.01348) / (0.3656 * 0.3656),
	k1:       1.511, k2: struct{ n, t float64 }{2.117, -1.0}, k3: struct{ n, t float64 }{-3.332, -0.7},
	visc: []residualTerm{
		{10.72, 0.1, 2, 0},
		{0.03989, 0.25, 10, 1},
		{0.001208, 3.2, 12, 1},
		{-7.402, 0.9, 2, 2},
		{4.62, 0.3, 1, 3},
	},
	cond: []residualTerm{
		{8.862, 0, 1, 0},
		{31.11, 0.03, 2, 0},
		{-73.13, 0.2, 3, 1},
		{20.03, 0.8, 4, 2},
		{-0.7096, 0.6, 8, 2},
		{0.2672, 1.9, 10, 2},
	},
}

var oxygenTransport = lemmonJacobsen{
	lnTc: math.Log(154.581), lnEpsilon: math.Log(118.5), rc: 13630,
	dilution: 0.0266958 * math.Sqrt(31.9988) / (0.3428 * 0.3428),
	k1:       1.036, k2: struct{ n, t float64 }{6.283, -0.9}, k3: struct{ n, t float64 }{-4.262, -0.6},
	visc: []residualTerm{
		{17.67, 0.05, 1, 0},
		{0.4042, 0, 5, 0},
		{0.0001077, 2.1, 12, 0},
		{0.351, 0, 8, 1},
		{-13.67, 0.5, 1, 2},
	},
	cond: []residualTerm{
		{15.31, 0, 1, 0},
		{8.898, 0, 3, 0},
		{-0.7336, 0.3, 4, 0},
		{6.728, 4.3, 5, 2},
		{-4.374, 0.5, 7, 2},
		{-0.4747, 1.8, 10, 2},
	},
}

var argonTransport = lemmonJacobsen{
	lnTc: math.Log(150.687), lnEpsilon: math.Log(143.2), rc: 13407.43,
	dilution: 0.0266958 * math.Sqrt(39.948) / (0.335 * 0.335),
	k1:       0.8158, k2: struct{ n, t float64 }{-0.432, -0.77}, k3: struct{ n, t float64 }{0.0, -1.0},
	visc: []residualTerm{
		{12.19, 0.42, 1, 0},
		{13.99, 0, 2, 0},
		{0.005027, 0.95, 10, 0},
		{-18.93, 0.5, 5, 2},
		{-6.698, 0.9, 1, 4},
		{-3.827, 0.8, 2, 4},
	},
	cond: []residualTerm{
		{13.73, 0, 1, 0},
		{10.07, 0, 2, 0},
		{0.7375, 0, 4, 0},
		{-33.96, 0.8, 5, 2},
		{20.47, 1.2, 6, 2},
		{-2.274, 0.8, 9, 2},
		{-3.973, 0.5, 1, 4},
	},
}
