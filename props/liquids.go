package props

import "example.com/coolward/internal/property"

// liquidRow holds T in K, density, specific heat, conductivity and viscosity in SI units.
type liquidRow [5]float64

// tabulated completes the data of a liquid of the package that is given by a table.
func tabulated(m medium, rows []liquidRow) *medium {
	columns := make([][]float64, len(liquidRow{}))
	for _, r := range rows {
		for i, x := range r {
			columns[i] = append(columns[i], x)
		}
	}
	l, err := property.NewLiquid(columns[0], columns[1], columns[2], columns[3], columns[4])
	if err != nil {
		panic("table of " + m.name + ": " + err.Error()) // while the package is initialised, or never
	}
	m.low, m.high = rows[0][0], rows[len(rows)-1][0]
	return tableMedium(l, m)
}

const (
	liquidSource = "F. P. Incropera et al., Fundamentals of Heat and Mass Transfer, 6th ed., table A.5, from memory: kinematic viscosity, diffusivity and " +
		"Prandtl number of each row agree; interpolated, the viscosity by its logarithm, and the expansion coefficient from the densities"
)

var engineOil = tabulated(medium{
	name: "engine oil", synonyms: []string{"motor oil", "unused engine oil"},
	source: liquidSource,
	pLow:   10e3, pHigh: 1e6,
	uncertainty: fluidUncertainty{
		density: 0.01, specificHeat: 0.03, conductivity: 0.05, viscosity: 0.1,
		source: "our own estimate, for the oil of the table; the viscosity of another oil differs by a factor of two and more, and the expansion coefficient has 15 %",
	},
}, []liquidRow{
	{273, 899.1, 1796, 0.147, 3.85},
	{280, 895.3, 1827, 0.144, 2.17},
	{290, 890, 1868, 0.145, 0.999},
	{300, 884.1, 1909, 0.145, 0.486},
	{310, 877.9, 1951, 0.145, 0.253},
	{320, 871.8, 1993, 0.143, 0.141},
	{330, 865.8, 2035, 0.141, 0.0836},
	{340, 859.9, 2076, 0.139, 0.0531},
	{350, 853.9, 2118, 0.138, 0.0356},
	{360, 847.8, 2161, 0.138, 0.0252},
	{370, 841.8, 2206, 0.137, 0.0186},
	{380, 836, 2250, 0.136, 0.0141},
	{390, 830.6, 2294, 0.135, 0.011},
	{400, 825.1, 2337, 0.134, 0.00874},
	{410, 818.9, 2381, 0.133, 0.00698},
	{420, 812.1, 2427, 0.133, 0.00564},
	{430, 806.5, 2471, 0.132, 0.0047},
})

// EngineOil returns one unused engine oil: 273 K to 430 K, 10 kPa to 1 MPa. Oils differ in viscosity by factors; one's own is
// made by [TabulatedLiquid].
//
// There is no quench oil here: what is published are ranges, in viscosity over a factor of five. A quench is to be
// calculated with the data sheet of the oil in the tank, and quench oils burn: their flash point limits the temperature of the bath.
func EngineOil() Medium { return Medium{engineOil} }

var glycerin = tabulated(medium{
	name: "glycerin", synonyms: []string{"glycerine", "glycerol"},
	source: liquidSource,
	pLow:   10e3, pHigh: 1e6,
	uncertainty: fluidUncertainty{
		density: 0.005, specificHeat: 0.03, conductivity: 0.05, viscosity: 0.16,
		source: "our own estimate, for glycerin without water: 1 % of water lowers the viscosity by about a fifth; the expansion coefficient has 15 %",
	},
}, []liquidRow{
	{273, 1276, 2261, 0.282, 10.6},
	{280, 1271.9, 2298, 0.284, 5.34},
	{290, 1265.8, 2367, 0.286, 1.85},
	{300, 1259.9, 2427, 0.286, 0.799},
	{310, 1253.9, 2490, 0.286, 0.352},
	{320, 1247.2, 2564, 0.287, 0.21},
})

// Glycerin returns pure glycerin: 273 K to 320 K, 10 kPa to 1 MPa. Below 291 K it is undercooled, as it usually is.
func Glycerin() Medium { return Medium{glycerin} }

var mercury = tabulated(medium{
	name: "mercury", synonyms: []string{"Hg"},
	source: liquidSource + "; the rows at both ends were read in another handbook with the same figures",
	pLow:   60e3, pHigh: 1e6,
	uncertainty: fluidUncertainty{
		density: 0.002, specificHeat: 0.01, conductivity: 0.05, viscosity: 0.03,
		source: "our own estimate, from the scatter between handbooks",
	},
}, []liquidRow{
	{273, 13595, 140.4, 8.18, 0.001688},
	{300, 13529, 139.3, 8.54, 0.001523},
	{350, 13407, 137.7, 9.18, 0.001309},
	{400, 13287, 136.5, 9.8, 0.001171},
	{450, 13167, 135.7, 10.4, 0.001075},
	{500, 13048, 135.3, 10.95, 0.001007},
	{550, 12929, 135.2, 11.45, 0.000953},
	{600, 12809, 135.5, 11.95, 0.000911},
})

// Mercury returns the liquid metal: 273 K to 600 K, 60 kPa to 1 MPa. It boils at 58 kPa at 600 K. Its vapour is poisonous.
func Mercury() Medium { return Medium{mercury} }

var sodium = medium{
	name: "sodium", synonyms: []string{"liquid sodium", "Na"},
	source: "J. K. Fink, L. Leibowitz, Thermodynamic and Transport Properties of Sodium Liquid and Vapor, ANL/RE-95/2 (1995), equations from memory; " +
		"they agree with a table that was read within 0.4 % in density, 1 % in specific heat, 2.1 % in viscosity and 5 % in conductivity",
	low: 371, high: 1300,
	pHigh:   1e6,
	boiling: property.SodiumSaturation,
	at: func(t, p float64) FluidState {
		rho, cp, k, mu, beta := property.Sodium(t)
		return fluidState(t, p, rho, cp, k, mu, beta)
	},
	uncertainty: fluidUncertainty{
		density: 0.005, specificHeat: 0.03, conductivity: 0.06, viscosity: 0.05,
		source: "figures of the report, from memory",
	},
}

// Sodium returns the liquid metal: 371 K, where it melts, to 1300 K, from the pressure at which it boils to 1 MPa. It burns in
// air and reacts violently with water.
func Sodium() Medium { return Medium{&sodium} }

var ammonia = tabulated(medium{
	name: "ammonia", synonyms: []string{"liquid ammonia", "NH3", "R717"},
	source: "saturated liquid: Thermal-Fluids Central, encyclopedia, page Thermophysical Properties: Ammonia, read, without the row at 200 K, whose specific heat breaks the trend; " +
		"interpolated, the viscosity by its logarithm, and the expansion coefficient from the densities along the saturation line",
	pHigh:   5e6,
	boiling: ammoniaSaturation.At,
	uncertainty: fluidUncertainty{
		density: 0.01, specificHeat: 0.03, conductivity: 0.05, viscosity: 0.05,
		source: "our own estimate; density includes 0.5 % for the compression up to 5 MPa, which is left out. The expansion coefficient at constant pressure is higher " +
			"than the one along the saturation line, by 2 % at 300 K and 10 % at 350 K",
	},
}, []liquidRow{
	{210, 717.5, 4375, 0.685, 0.000369},
	{220, 705.8, 4346, 0.661, 0.000334},
	{230, 693.7, 4382, 0.638, 0.000302},
	{240, 681.4, 4431, 0.615, 0.000273},
	{250, 668.9, 4483, 0.592, 0.000245},
	{260, 656.1, 4539, 0.569, 0.00022},
	{270, 642.9, 4597, 0.546, 0.000197},
	{280, 629.2, 4662, 0.523, 0.000176},
	{290, 615.0, 4734, 0.5, 0.0001577},
	{300, 600.2, 4815, 0.477, 0.000141},
	{310, 584.6, 4909, 0.454, 0.000126},
	{320, 568.2, 5024, 0.431, 0.0001134},
	{330, 550.9, 5170, 0.408, 0.0001019},
	{340, 532.4, 5366, 0.385, 9.21e-05},
	{350, 512.3, 5639, 0.361, 8.32e-05},
})

var ammoniaSaturation = saturationLine("ammonia",
	[]float64{210, 220, 230, 240, 250, 260, 270, 280, 290, 300, 310, 320, 330, 340, 350},
	[]float64{
		17746, 33811, 60439, 102260, 164960, 255290, 381000, 550770, 774130, 1.0614e+06, 1.4235e+06, 1.8721e+06, 2.4196e+06, 3.0789e+06, 3.8641e+06,
	})

func saturationLine(name string, t, p []float64) *property.SaturationLine {
	s, err := property.NewSaturationLine(t, p)
	if err != nil {
		panic("saturation of " + name + ": " + err.Error()) // while the package is initialised, or never
	}
	return s
}

// Ammonia returns liquid ammonia: 210 K to 350 K, from the pressure at which it boils to 5 MPa. The properties are those of the
// saturated liquid. Its vapour is poisonous.
func Ammonia() Medium { return Medium{ammonia} }
