package props

import (
	"slices"
	"sync"
)

// plastics returns plastics that EN ISO 10456 does not list.
var plastics = sync.OnceValue(func() []Solid {
	return makePlain(&class{
		source: "R. J. Crawford, Plastics Engineering, table 1.8, rounded values at room temperature, held constant, ",
		low:    celsius(0), high: celsius(60),
		uncertainty: solidUncertainty{
			density: 0.05, specificHeat: 0.20, conductivity: 0.30,
			source: "our own estimate: the table is rounded to 15 %, and the specific heat rises with the temperature; the range is our own judgement",
		},
	}, []plain{
		{"ABS", []string{"acrylonitrile butadiene styrene"}, 1040, 1300, 0.25, read},
		{"acetal copolymer", []string{"POM copolymer"}, 1410, 1500, 0.2, read},
		{"cellulose acetate", nil, 1280, 1600, 0.15, read},
		{"polyamide 66", []string{"nylon 66", "PA 66"}, 1140, 1700, 0.24, read + ", the density restored from a garbled digit"},
		{"polyamide 66, 33 % glass fibre", nil, 1380, 1600, 0.52, read},
		{"PET", []string{"polyethylene terephthalate"}, 1360, 1000, 0.2, read},
		{"SAN", []string{"styrene acrylonitrile"}, 1080, 1300, 0.17, read},
	})
})

// commonMaterials returns materials of tables A.3 of Incropera et al. and of CIBSE Guide A that the other lists do not have.
var commonMaterials = sync.OnceValue(func() []Solid {
	estimate := solidUncertainty{
		density: 0.15, specificHeat: 0.20, conductivity: 0.30,
		source: "our own estimate, between pieces of the name; the range is our own judgement",
	}
	return slices.Concat(
		makePlain(&class{
			source: "F. P. Incropera, D. P. DeWitt, T. L. Bergman, A. S. Lavine, Fundamentals of Heat and Mass Transfer, 6th ed., table A.3, at 300 K, held constant, ",
			low:    celsius(0), high: celsius(60), uncertainty: estimate,
		}, []plain{
			{"soft rubber", []string{"soft vulcanised rubber"}, 1100, 2010, 0.13, recalled},
			{"paper", nil, 930, 1340, 0.180, recalled},
			{"solid paraffin", []string{"paraffin wax"}, 900, 2890, 0.240, recalled},
			{"cotton", nil, 80, 1300, 0.06, recalled},
			{"anthracite", []string{"coal"}, 1350, 1260, 0.26, recalled},
			{"quartzite", nil, 2640, 1105, 5.38, recalled},
			{"dry sand", nil, 1515, 800, 0.27, recalled},
			{"common brick", []string{"brick", "clay brick"}, 1920, 835, 0.72, recalled},
		}),
		makePlain(&class{
			source: "CIBSE Guide A, tables 3.36 and 3.37, held constant, ",
			low:    celsius(0), high: celsius(60), uncertainty: estimate,
		}, []plain{
			{"poured asphalt", nil, 2100, 920, 1.20, read},
			{"asphalt roofing mastic", []string{"mastic asphalt"}, 2330, 840, 1.15, read},
			{"bitumen composite flooring", nil, 2400, 1000, 0.85, read},
			{"glass foam", nil, 140, 840, 0.052, read},
			{"roofing felt", nil, 960, 840, 0.19, read},
			{"expanded rubber board", nil, 70, 1680, 0.032, read},
			{"PVC foam", nil, 37, 1470, 0.035, read},
		}),
	)
})
