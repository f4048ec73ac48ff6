package property

import "math"

// FoodFractions is a composition by mass.
type FoodFractions struct{ Protein, Fat, Carbohydrate, Fibre, Ash, Water float64 }

// Food is a food by the equations of Y. Choi and M. R. Okos, Effects of temperature and composition on the thermal
// properties of foods, in: M. Le Maguer, P. Jelen (eds.), Food Engineering and Process Applications, vol. 1, 1986:
// polynomials of t in °C for each component, which add by mass, or by volume for the conductivity. Below the freezing
// point the ice is the part
//
//	(w − b) (1 − tf/t)
//
// of the mass, where w is the water and b = 0.4 protein is bound and does not freeze (ASHRAE Handbook Refrigeration,
// chapter Thermal properties of foods, from memory). The enthalpy is the sum of those of the parts, ice lower
// by the latent heat at 0 °C, so that it is continuous, and the specific heat is its derivative.
type Food struct {
	structure Structure
	x         [5]float64 // protein, fat, carbohydrate, fibre, ash
	water     float64
	freezable float64
	freezing  float64 // °C, below 0
	c         quadratic
	porosity  float64
}

// quadratic has the coefficients of 1, t and t².
type quadratic [3]float64

func (q *quadratic) at(t float64) float64 { return q[0] + t*(q[1]+t*q[2]) }

func (q *quadratic) integral(t float64) float64 { return t * (q[0] + t*(q[1]/2+t*(q[2]/3))) }

// Coefficients of Choi and Okos, read on copies whose slipped digits were put right by the other copies. The specific
// heat of water is the original 4176.2 J/(kg K) and 4081.7 J/(kg K), not the 4128.9 J/(kg K) of later tables.
var (
	foodK = [5]quadratic{
		{0.17881, 0.0011958, -2.7178e-06},
		{0.18071, -0.00027604, -1.7749e-07},
		{0.20141, 0.0013874, -4.3312e-06},
		{0.18331, 0.0012497, -3.1683e-06},
		{0.32962, 0.0014011, -2.9069e-06},
	}
	foodRho = [5][2]float64{
		{1329.9, -0.5184}, {925.59, -0.41757}, {1599.1, -0.31046}, {1311.5, -0.36589}, {2423.8, -0.28063},
	}
	foodC = [5]quadratic{
		{2008.2, 1.2089, -0.0013129},
		{1984.2, 1.4733, -0.0048008},
		{1548.8, 1.9625, -0.0059399},
		{1845.9, 1.8306, -0.0046509},
		{1092.6, 1.8896, -0.0036817},
	}
	foodWaterK     = quadratic{0.57109, 0.0017625, -6.7036e-06}
	foodWaterRho   = quadratic{997.18, 0.0031439, -0.0037574}
	foodWaterC     = quadratic{4176.2, -0.090864, 0.0054731}
	foodSupercoolC = quadratic{4081.7, -5.3062, 0.99516}
	foodIceK       = quadratic{2.2196, -0.0062489, 0.00010154}
	foodIceRho     = quadratic{916.89, -0.13071, 0}
	foodIceC       = quadratic{2062.3, 6.0769, 0}
)

const (
	foodLatent = 333.6e3 // J/kg of ice at 0 °C, ASHRAE, from memory
	foodPores  = 0.025   // W/(m K), air in the pores
)

// NewFood returns the food. Freezing is the initial freezing point in K; it is not used where no water freezes.
func NewFood(x FoodFractions, freezing, porosity float64, structure Structure) *Food {
	f := &Food{
		structure: structure,
		x:         [5]float64{x.Protein, x.Fat, x.Carbohydrate, x.Fibre, x.Ash},
		water:     x.Water, freezable: x.Freezable(), freezing: freezing - zeroCelsius, porosity: porosity,
	}
	for i, xi := range f.x {
		for j := range f.c {
			f.c[j] += xi * foodC[i][j]
		}
	}
	return f
}

// Freezable returns the mass fraction of the water that can freeze.
func (x FoodFractions) Freezable() float64 { return max(0, x.Water-0.4*x.Protein) }

// Ice returns the mass fraction of ice.
func (f *Food) Ice(t float64) float64 {
	ice, _ := f.ice(t - zeroCelsius)
	return ice
}

// ice returns the mass fraction of ice at t in °C, and its derivative.
func (f *Food) ice(t float64) (ice, slope float64) {
	if f.freezable == 0 || t >= f.freezing {
		return 0, 0
	}
	r := f.freezing / t
	return f.freezable * (1 - r), f.freezable * r / t
}

// SpecificHeat includes the latent heat of the water that freezes.
func (f *Food) SpecificHeat(t float64) float64 {
	t -= zeroCelsius
	c := f.c.at(t)
	if t >= 0 {
		return c + f.water*foodWaterC.at(t)
	}
	ice, slope := f.ice(t)
	c += (f.water - ice) * foodSupercoolC.at(t)
	if ice > 0 {
		c += ice*foodIceC.at(t) - slope*(foodLatent+foodSupercoolC.integral(t)-foodIceC.integral(t))
	}
	return c
}

// Enthalpy is zero for the unfrozen food at 0 °C.
func (f *Food) Enthalpy(t float64) float64 {
	t -= zeroCelsius
	h := f.c.integral(t)
	if t >= 0 {
		return h + f.water*foodWaterC.integral(t)
	}
	ice, _ := f.ice(t)
	return h + (f.water-ice)*foodSupercoolC.integral(t) + ice*(foodIceC.integral(t)-foodLatent)
}

// Conductivity combines the components by volume. Dispersed is the equation of Maxwell and Eucken twice: ice in
// water, and the other components, parallel to each other, in both. Pores are dispersed in the whole.
func (f *Food) Conductivity(t float64) float64 {
	t -= zeroCelsius
	ice, _ := f.ice(t)
	var k float64
	if f.structure == Dispersed {
		k = f.dispersed(t, ice)
	} else {
		k = f.mixed(t, ice)
	}
	if f.porosity > 0 {
		k = maxwell(k, foodPores, f.porosity)
	}
	return k
}

func (f *Food) dispersed(t, ice float64) float64 {
	var solids, conductance float64
	for i, x := range f.x {
		v := x / (foodRho[i][0] + t*foodRho[i][1])
		solids += v
		conductance += v * foodK[i].at(t)
	}
	if f.water == 0 {
		return conductance / solids
	}
	wet := (f.water - ice) / foodWaterRho.at(t)
	k := foodWaterK.at(t)
	if ice > 0 {
		frozen := ice / foodIceRho.at(t)
		k = maxwell(k, foodIceK.at(t), frozen/(frozen+wet))
		wet += frozen
	}
	if solids == 0 {
		return k
	}
	return maxwell(k, conductance/solids, solids/(solids+wet))
}

// mixed is Parallel, Series or Geometric.
func (f *Food) mixed(t, ice float64) float64 {
	var volume, sum float64
	add := func(v, k float64) {
		volume += v
		switch f.structure {
		case Parallel:
			sum += v * k
		case Series:
			sum += v / k
		default:
			sum += v * math.Log(k)
		}
	}
	for i, x := range f.x {
		add(x/(foodRho[i][0]+t*foodRho[i][1]), foodK[i].at(t))
	}
	add((f.water-ice)/foodWaterRho.at(t), foodWaterK.at(t))
	if ice > 0 {
		add(ice/foodIceRho.at(t), foodIceK.at(t))
	}
	switch f.structure {
	case Parallel:
		return sum / volume
	case Series:
		return volume / sum
	}
	return math.Exp(sum / volume)
}

// maxwell returns the conductivity of a body with the conductivity k in which spheres with kd take the part phi of the volume
// (A. Eucken, VDI Forschungsheft 353, 1932, from memory).
func maxwell(k, kd, phi float64) float64 {
	d := phi * (k - kd)
	return k * (2*k + kd - 2*d) / (2*k + kd + d)
}

// Density is that at t, with the pores.
func (f *Food) Density(t float64) float64 {
	t -= zeroCelsius
	ice, _ := f.ice(t)
	v := (f.water-ice)/foodWaterRho.at(t) + ice/foodIceRho.at(t)
	for i, x := range f.x {
		v += x / (foodRho[i][0] + t*foodRho[i][1])
	}
	return (1 - f.porosity) / v
}
