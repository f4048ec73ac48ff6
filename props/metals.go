package props

import "example.com/coolward/internal/property"

var carbonSteel = newSolid(material{
	name:     "carbon steel",
	synonyms: []string{"steel", "mild steel", "structural steel"},
	source: "EN 1993-1-2:2005, clauses 3.2.2 and 3.4.1, 20 °C to 1200 °C: specific heat read on a page that quotes the clause, " +
		"slope of the conductivity and density from memory. From 0 °C to 20 °C, which the clause does not cover, its equations are continued: " +
		"our own judgement, they agree within the uncertainty with EN ISO 10456:2007 (50 W/(m K), 450 J/(kg K) at 10 °C to 23 °C) and with " +
		"45 W/(m K) to 65 W/(m K) for AISI 1095 and 1020 at 273 K (CRC Handbook, thermal conductivity of alloys)",
	caution: fireCaution,
	density: 7850,
	low:     celsius(0), high: celsius(1200),
	kinks: []float64{celsius(600), celsius(735), celsius(800), celsius(900)},
	curve: property.CarbonSteel{},
	uncertainty: solidUncertainty{
		density: 0.01, specificHeat: 0.10, conductivity: 0.22,
		source: "our own estimate, from the scatter of handbook values of plain and low-alloy steels up to about 0.5 % carbon; from 650 °C to 850 °C the place and height " +
			"of the peak of the specific heat depend on composition and rate, and only the heat across it, to 10 %, means something; thermal expansion is not included",
	},
})

// CarbonSteel returns structural carbon steel of EN 1993-1-2: 0 °C to 1200 °C, density 7850 kg/m³. The specific heat
// peaks at 735 °C with 5000 J/(kg K), and the enthalpy is its exact integral. The kinks lie at 600 °C,
// 735 °C, 800 °C and 900 °C.
func CarbonSteel() Solid { return carbonSteel }

const incropera = "F. P. Incropera, D. P. DeWitt, T. L. Bergman, A. S. Lavine, Fundamentals of Heat and Mass Transfer, 6th ed., table A.1, "

const interpolated = "; between the rows a monotone cubic"

var stainlessSteel = table(material{
	name:     "stainless steel",
	synonyms: []string{"austenitic stainless steel", "AISI 304", "1.4301"},
	source:   incropera + "AISI 304, from memory" + interpolated,
	density:  7900,
	uncertainty: solidUncertainty{
		density: 0.02, specificHeat: 0.13, conductivity: 0.10,
		source: "our own estimate, from handbook values of austenitic grades and from EN 1993-1-2, annex C, whose specific heat is lower by 4 % at 20 °C and by 12 % at 1200 °C; thermal expansion is not included",
	},
}, []float64{200, 300, 400, 600, 800, 1000, 1200, 1500},
	[]float64{12.6, 14.9, 16.6, 19.8, 22.6, 25.4, 28.0, 31.7},
	[]float64{402, 477, 515, 557, 582, 611, 640, 682})

// StainlessSteel returns austenitic stainless steel AISI 304: 200 K to 1500 K, density 7900 kg/m³.
func StainlessSteel() Solid { return stainlessSteel }

var copper = table(material{
	name:     "copper",
	synonyms: []string{"pure copper"},
	source:   incropera + "pure copper; the rows of 300 K, 600 K and 1200 K were read, the others are from memory" + interpolated,
	density:  8933,
	uncertainty: solidUncertainty{
		density: 0.01, specificHeat: 0.03, conductivity: 0.05,
		source: "our own estimate, from 3 % to 5 % at 300 K that the assessments of the pure metals state (from memory); it covers electrolytic copper, " +
			"not alloys and not phosphorus-deoxidised copper (as low as 300 W/(m K), from memory); thermal expansion is not included",
	},
}, []float64{200, 300, 400, 600, 800, 1000, 1200},
	[]float64{413, 401, 393, 379, 366, 352, 339},
	[]float64{356, 385, 397, 417, 433, 451, 480})

// Copper returns pure copper: 200 K to 1200 K, density 8933 kg/m³.
func Copper() Solid { return copper }

var aluminium = table(material{
	name:     "aluminium",
	synonyms: []string{"aluminum", "pure aluminium"},
	source:   incropera + "pure aluminium, read" + interpolated,
	density:  2702,
	uncertainty: solidUncertainty{
		density: 0.01, specificHeat: 0.03, conductivity: 0.08,
		source: "our own estimate; it covers commercial purity from 99 % (AISI 1100: 220 W/(m K)), not alloys, which conduct 120 W/(m K) to 200 W/(m K); thermal expansion is not included",
	},
}, []float64{200, 300, 400, 600, 800},
	[]float64{237, 237, 240, 231, 218},
	[]float64{798, 903, 949, 1033, 1146})

// Aluminium returns pure aluminium: 200 K to 800 K, density 2702 kg/m³. Alloys conduct less: use a table of one's own.
func Aluminium() Solid { return aluminium }

// table completes a built-in solid from columns of K, W/(m K) and J/(kg K).
func table(m material, t, k, c []float64) Solid {
	curve, err := property.NewTable(t, k, c)
	if err != nil {
		return Solid{} // an empty solid, which the tests of the package would find
	}
	m.curve, m.low, m.high = curve, t[0], t[len(t)-1]
	return newSolid(m)
}

// celsius returns t in °C as kelvin.
func celsius(t float64) float64 { return t + 273.15 }
