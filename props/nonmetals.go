package props

import "example.com/coolward/internal/property"

var glass = newSolid(material{
	name:     "glass",
	synonyms: []string{"soda-lime glass", "float glass", "window glass"},
	source: "conductivity at 10 °C and density: CIBSE Guide A, tables 3.36 and 3.37, solid soda-lime glass, read on a copy, held constant; " +
		"specific heat: Sharp, Ginther, J. Am. Ceram. Soc. 34 (1951) 260, sum over the oxides of float glass (SiO2 72 %, Na2O 14 %, CaO 9 %, MgO 4 %, Al2O3 1 % by mass), from memory",
	density: 2500,
	low:     celsius(0), high: celsius(200),
	curve: property.NewGlass(1.05, property.Oxides{SiO2: 0.72, Na2O: 0.14, CaO: 0.09, MgO: 0.04, Al2O3: 0.01}),
	uncertainty: solidUncertainty{
		density: 0.02, specificHeat: 0.07, conductivity: 0.20,
		source: "our own estimate: the equation of the specific heat is within 4 % of a handbook table of fused silica and within 6 % of handbook and design values of soda-lime glass; " +
			"the constant conductivity has to cover handbook values from 1.0 W/(m K) and a rise of some 15 % to 200 °C",
	},
})

// Glass returns soda-lime glass: 0 °C to 200 °C, density 2500 kg/m³. The conductivity is constant, with an uncertainty that
// covers its rise; the specific heat rises by a third.
func Glass() Solid { return glass }

var pvc = newSolid(material{
	name:     "PVC",
	synonyms: []string{"rigid PVC", "polyvinyl chloride"},
	source: "R. J. Crawford, Plastics Engineering, table 1.8, rigid PVC, read, rounded values at room temperature, held constant; " +
		"the range is our own judgement",
	density: 1400,
	low:     celsius(0), high: celsius(60),
	constant: true,
	curve:    property.Constant{K: 0.16, C: 900},
	uncertainty: solidUncertainty{
		density: 0.05, specificHeat: 0.20, conductivity: 0.15,
		source: "our own estimate: the table is rounded to 15 %, and the specific heat rises with the temperature; above 60 °C the material begins to soften",
	},
})

// PVC returns rigid polyvinyl chloride with constant properties: 0 °C to 60 °C, density 1400 kg/m³.
func PVC() Solid { return pvc }

var softwood = newSolid(material{
	name:     "softwood",
	synonyms: []string{"wood", "timber"},
	source: "EN ISO 10456:2007, table 3, timber of 500 kg/m³ across the grain, design values at 10 °C to 23 °C, read on a page that quotes the draft prEN 12524:1998, held constant; " +
		"the range is our own judgement",
	density: 500,
	low:     celsius(0), high: celsius(60),
	constant: true,
	curve:    property.Constant{K: 0.13, C: 1600},
	uncertainty: solidUncertainty{
		density: 0.20, specificHeat: 0.20, conductivity: 0.25,
		source: "our own estimate, for air-dry wood across the grain: between species, with some per cent of moisture, and over the range; along the grain it conducts about twice as much",
	},
})

// Softwood returns air-dry softwood, across the grain, with constant properties: 0 °C to 60 °C, density 500 kg/m³.
func Softwood() Solid { return softwood }
