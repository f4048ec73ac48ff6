package props

import "sync"

const incropera2 = "F. P. Incropera, D. P. DeWitt, T. L. Bergman, A. S. Lavine, Fundamentals of Heat and Mass Transfer, 6th ed., table A.2, "

// ceramics returns ceramics and glasses with tables.
var ceramics = sync.OnceValue(func() []Solid {
	ceramic := &class{source: incropera2, uncertainty: solidUncertainty{
		density: 0.03, specificHeat: 0.05, conductivity: 0.20,
		source: "our own estimate, for dense material of high purity; porosity lowers the conductivity; thermal expansion is not included",
	}}
	silica := &class{source: incropera2 + "the conductivity includes radiation within the glass above 700 K; ", uncertainty: solidUncertainty{
		density: 0.02, specificHeat: 0.05, conductivity: 0.15,
		source: "our own estimate; above 700 K the conductivity depends on the thickness, because it includes radiation",
	}}
	brick := &class{source: incropera2, uncertainty: solidUncertainty{
		density: 0.15, specificHeat: 0.15, conductivity: 0.30,
		source: "our own estimate, between makes and firing; the specific heat is one value for all temperatures in the source",
	}}
	return makeTabled([]tabled{
		{
			"alumina",
			[]string{"aluminium oxide", "polycrystalline alumina"},
			3970, ceramic, read,
			[]float64{300, 400, 600, 800, 1000},
			[]float64{36.0, 26.4, 15.8, 10.4, 7.85},
			[]float64{765, 940, 1110, 1180, 1225},
		},
		{
			"sapphire",
			[]string{"alumina single crystal"},
			3970, ceramic, read,
			[]float64{300, 400, 600, 800, 1000},
			[]float64{46, 32.4, 18.9, 13.0, 10.5},
			[]float64{765, 940, 1110, 1180, 1225},
		},
		{
			"silicon carbide",
			[]string{"SiC"},
			3160, ceramic, read,
			[]float64{1000, 1200, 1500},
			[]float64{87, 58, 30},
			[]float64{1195, 1243, 1310},
		},
		{
			"glass-ceramic",
			[]string{"cordierite glass-ceramic"},
			2600, ceramic, recalled,
			[]float64{300, 400, 600, 800, 1000},
			[]float64{3.98, 3.64, 3.28, 3.08, 2.96},
			[]float64{808, 908, 1038, 1122, 1197},
		},
		{
			"fused silica",
			[]string{"vitreous silica"},
			2220, silica, recalled,
			[]float64{300, 400, 600, 800, 1000},
			[]float64{1.38, 1.51, 1.75, 2.17, 2.87},
			[]float64{745, 905, 1040, 1105, 1155},
		},
		{
			"fireclay brick",
			[]string{"firebrick"},
			2645, brick, recalled,
			[]float64{478, 922, 1478},
			[]float64{1.0, 1.5, 1.8},
			[]float64{960, 960, 960},
		},
	})
})
