package props

import (
	"sync"

	"example.com/coolward/internal/property"
)

// A tabled solid is made from columns of K, W/(m K) and J/(kg K).
type tabled struct {
	name     string
	synonyms []string
	density  float64
	class    *class
	status   string
	t, k, c  []float64
}

// A class holds what the solids of a table share.
type class struct {
	source      string // the status of the row follows
	caution     string
	low, high   float64 // K, where the rows do not say it
	uncertainty solidUncertainty
}

// What is known of the figures of a row.
const (
	read     = "read"
	read300  = "the row of 300 K was read, the others are from memory"
	readSome = "the rows of 100 K, 300 K, 600 K and 1200 K were read, the others are from memory"
	recalled = "from memory"
)

const noExpansion = "; thermal expansion is not included"

var (
	pureMetal = &class{source: incropera, uncertainty: solidUncertainty{
		density: 0.01, specificHeat: 0.06, conductivity: 0.10,
		source: "3 % to 5 % near room temperature and 5 % to 10 % elsewhere for the conductivity of well-annealed metal of high purity (assessments of the pure metals, from memory); " +
			"specific heat: our own estimate, and between the rows of 100 K and 200 K it is the interpolation" + noExpansion,
	}}
	curieMetal = &class{source: incropera, uncertainty: solidUncertainty{
		density: 0.01, specificHeat: 0.12, conductivity: 0.10,
		source: "as for other pure metals, but the specific heat has a peak at the Curie point (iron 1043 K, nickel 631 K) that the rows do not resolve: our own estimate" + noExpansion,
	}}
	alloy = &class{source: incropera, uncertainty: solidUncertainty{
		density: 0.02, specificHeat: 0.10, conductivity: 0.25,
		source: "our own estimate: composition and heat treatment change the conductivity of alloys by 10 % to 30 %" + noExpansion,
	}}
	heldAlloy = &class{source: incropera + "the specific heat is that of 300 K, held constant; ", uncertainty: solidUncertainty{
		density: 0.02, specificHeat: 0.18, conductivity: 0.25,
		source: "our own estimate: composition and heat treatment change the conductivity of alloys by 10 % to 30 %, and the specific heat that is held constant rises by some 15 % to 600 K" + noExpansion,
	}}
	steelAlloy = &class{source: incropera, uncertainty: solidUncertainty{
		density: 0.03, specificHeat: 0.12, conductivity: 0.20,
		source: "our own estimate, from the scatter between grades; the specific heat rises to its peak near 1010 K, and above 900 K only its integral, to 10 %, means something" + noExpansion,
	}}
)

// tabledMetals returns the metals and alloys with a table of their own. The ranges end below the melting point, and
// below the change of phase of iron (1043 K and 1185 K), titanium (1155 K) and zirconium (1135 K), which the rows do
// not resolve.
var tabledMetals = sync.OnceValue(func() []Solid {
	rows := []tabled{
		{
			"aluminium alloy 2024",
			[]string{"duralumin", "AlCu4Mg1"},
			2770, alloy, read,
			[]float64{200, 300, 400, 600},
			[]float64{163, 177, 186, 186},
			[]float64{787, 875, 925, 1042},
		},
		{
			"cast aluminium alloy 195",
			[]string{"AlCu4 casting"},
			2790, heldAlloy, read300,
			[]float64{300, 400, 600},
			[]float64{168, 174, 185},
			[]float64{883, 883, 883},
		},
		{
			"chromium", nil, 7160, pureMetal, recalled,
			[]float64{100, 200, 300, 400, 600, 800, 1000, 1200, 1500},
			[]float64{159, 111, 93.7, 90.9, 80.7, 71.3, 65.4, 61.9, 57.2},
			[]float64{192, 384, 449, 484, 542, 581, 616, 682, 779},
		},
		{
			"aluminium bronze 90Cu-10Al",
			[]string{"commercial bronze"},
			8800, alloy, read300,
			[]float64{300, 400, 600},
			[]float64{52, 52, 59},
			[]float64{420, 460, 545},
		},
		{
			"phosphor bronze 89Cu-11Sn",
			[]string{"gear bronze", "tin bronze"},
			8780, heldAlloy, read300,
			[]float64{200, 300, 400, 600},
			[]float64{41, 54, 65, 74},
			[]float64{355, 355, 355, 355},
		},
		{
			"cartridge brass 70Cu-30Zn",
			[]string{"CuZn30"},
			8530, alloy, read300,
			[]float64{200, 300, 400, 600},
			[]float64{95, 110, 137, 149},
			[]float64{360, 380, 395, 425},
		},
		{
			"constantan 55Cu-45Ni",
			[]string{"constantan", "CuNi44"},
			8920, alloy, recalled,
			[]float64{100, 200, 300},
			[]float64{17, 19, 23},
			[]float64{237, 362, 384},
		},
		{
			"gold", nil, 19300, pureMetal, read,
			[]float64{100, 200, 300, 400, 600, 800, 1000, 1200},
			[]float64{327, 323, 317, 311, 298, 284, 270, 255},
			[]float64{109, 124, 129, 131, 135, 140, 145, 155},
		},
		{
			"iron",
			[]string{"pure iron"},
			7870, curieMetal, readSome,
			[]float64{100, 200, 300, 400, 600, 800, 1000},
			[]float64{134, 94, 80.2, 69.5, 54.7, 43.3, 32.8},
			[]float64{216, 384, 447, 490, 574, 680, 975},
		},
		{
			"commercial pure iron",
			[]string{"ingot iron", "iron 99.75 %"},
			7870, steelAlloy, read300,
			[]float64{100, 200, 300, 400, 600, 800, 1000},
			[]float64{95.6, 80.6, 72.7, 65.7, 53.1, 42.2, 32.3},
			[]float64{215, 384, 447, 490, 574, 680, 975},
		},
		{
			"plain carbon steel",
			[]string{"unalloyed steel"},
			7854, steelAlloy, read300,
			[]float64{300, 400, 600, 800, 1000},
			[]float64{60.5, 56.7, 48, 39.2, 30},
			[]float64{434, 487, 559, 685, 1169},
		},
		{
			"steel AISI 1010",
			[]string{"low-carbon steel", "C10"},
			7832, steelAlloy, read300,
			[]float64{300, 400, 600, 800, 1000},
			[]float64{63.9, 58.7, 48.8, 39.2, 31.3},
			[]float64{434, 487, 559, 685, 1168},
		},
		{
			"carbon-silicon steel", nil, 7817, steelAlloy, read300,
			[]float64{300, 400, 600, 800, 1000},
			[]float64{51.9, 49.8, 44, 37.4, 29.3},
			[]float64{446, 501, 582, 699, 971},
		},
		{
			"carbon-manganese-silicon steel", nil, 8131, steelAlloy, read300,
			[]float64{300, 400, 600, 800, 1000},
			[]float64{41, 42.2, 39.7, 35, 27.6},
			[]float64{434, 487, 559, 685, 1090},
		},
		{
			"steel 0.5Cr-0.25Mo-Si", nil, 7822, steelAlloy, read300,
			[]float64{300, 400, 600, 800, 1000},
			[]float64{37.7, 38.2, 36.7, 33.3, 26.9},
			[]float64{444, 492, 575, 688, 969},
		},
		{
			"steel 1Cr-0.5Mo",
			[]string{"13CrMo4-5"},
			7858, steelAlloy, recalled,
			[]float64{300, 400, 600, 800, 1000},
			[]float64{42.3, 42, 39.1, 34.5, 27.4},
			[]float64{442, 492, 575, 688, 969},
		},
		{
			"steel 1Cr-V",
			[]string{"chromium-vanadium steel"},
			7836, steelAlloy, recalled,
			[]float64{300, 400, 600, 800, 1000},
			[]float64{48.9, 46.8, 42.1, 36.3, 28.2},
			[]float64{443, 492, 575, 688, 969},
		},
		{
			"stainless steel AISI 302",
			[]string{"1.4319"},
			8055, alloy, recalled,
			[]float64{300, 400, 600, 800, 1000},
			[]float64{15.1, 17.3, 20, 22.8, 25.4},
			[]float64{480, 512, 559, 585, 606},
		},
		{
			"stainless steel AISI 316",
			[]string{"1.4401"},
			8238, alloy, recalled,
			[]float64{300, 400, 600, 800, 1000},
			[]float64{13.4, 15.2, 18.3, 21.3, 24.2},
			[]float64{468, 504, 550, 576, 602},
		},
		{
			"stainless steel AISI 347",
			[]string{"1.4550"},
			7978, alloy, recalled,
			[]float64{300, 400, 600, 800, 1000},
			[]float64{14.2, 15.8, 18.9, 21.9, 24.7},
			[]float64{480, 513, 559, 585, 606},
		},
		{
			"lead", nil, 11340, pureMetal, read,
			[]float64{100, 200, 300, 400, 600},
			[]float64{39.7, 36.7, 35.3, 34, 31.4},
			[]float64{118, 125, 129, 132, 142},
		},
		{
			"magnesium", nil, 1740, pureMetal, read,
			[]float64{100, 200, 300, 400, 600, 800},
			[]float64{169, 159, 156, 153, 149, 146},
			[]float64{649, 934, 1024, 1074, 1170, 1267},
		},
		{
			"molybdenum", nil, 10240, pureMetal, read,
			[]float64{100, 200, 300, 400, 600, 800, 1000, 1200, 1500},
			[]float64{179, 143, 138, 134, 126, 118, 112, 105, 98},
			[]float64{141, 224, 251, 261, 275, 285, 295, 308, 330},
		},
		{
			"nickel",
			[]string{"pure nickel"},
			8900, curieMetal, readSome,
			[]float64{100, 200, 300, 400, 600, 800, 1000, 1200, 1500},
			[]float64{164, 107, 90.7, 80.2, 65.6, 67.6, 71.8, 76.2, 82.6},
			[]float64{232, 383, 444, 485, 592, 530, 562, 594, 616},
		},
		{
			"nickel-chromium 80Ni-20Cr",
			[]string{"resistance wire alloy"},
			8400, alloy, recalled,
			[]float64{300, 400, 600, 800},
			[]float64{12, 14, 16, 21},
			[]float64{420, 480, 525, 545},
		},
		{
			"nickel alloy N07750",
			[]string{"NiCr15Fe7TiAl"},
			8510, alloy, recalled,
			[]float64{200, 300, 400, 600, 800, 1000},
			[]float64{10.3, 11.7, 13.5, 17, 20.5, 24},
			[]float64{372, 439, 473, 510, 546, 626},
		},
		{
			"platinum", nil, 21450, pureMetal, readSome,
			[]float64{100, 200, 300, 400, 600, 800, 1000, 1200, 1500},
			[]float64{77.5, 72.6, 71.6, 71.8, 73.2, 75.6, 78.7, 82.6, 89.5},
			[]float64{100, 125, 133, 136, 141, 146, 152, 157, 165},
		},
		{
			"silicon", nil, 2330, pureMetal, readSome,
			[]float64{200, 300, 400, 600, 800, 1000, 1200, 1500},
			[]float64{264, 148, 98.9, 61.9, 42.2, 31.2, 25.7, 22.7},
			[]float64{556, 712, 790, 867, 913, 946, 967, 992},
		},
		{
			"silver", nil, 10500, pureMetal, readSome,
			[]float64{100, 200, 300, 400, 600, 800, 1000, 1200},
			[]float64{444, 430, 429, 425, 412, 396, 379, 361},
			[]float64{187, 225, 235, 239, 250, 262, 277, 292},
		},
		{
			"tin",
			[]string{"white tin"},
			7310, pureMetal, read,
			[]float64{100, 200, 300, 400},
			[]float64{85.2, 73.3, 66.6, 62.2},
			[]float64{188, 215, 227, 243},
		},
		{
			"titanium",
			[]string{"pure titanium"},
			4500, pureMetal, read,
			[]float64{100, 200, 300, 400, 600, 800, 1000},
			[]float64{30.5, 24.5, 21.9, 20.4, 19.4, 19.7, 20.7},
			[]float64{300, 465, 522, 551, 591, 633, 675},
		},
		{
			"tungsten",
			[]string{"wolfram"},
			19300, pureMetal, read,
			[]float64{100, 200, 300, 400, 600, 800, 1000, 1200, 1500},
			[]float64{208, 186, 174, 159, 137, 125, 118, 113, 107},
			[]float64{87, 122, 132, 137, 142, 145, 148, 152, 157},
		},
		{
			"zinc", nil, 7140, pureMetal, recalled,
			[]float64{100, 200, 300, 400, 600},
			[]float64{117, 118, 116, 111, 103},
			[]float64{297, 367, 389, 402, 436},
		},
		{
			"zirconium", nil, 6570, pureMetal, recalled,
			[]float64{100, 200, 300, 400, 600, 800, 1000},
			[]float64{33.2, 25.2, 22.7, 21.6, 20.7, 21.6, 23.7},
			[]float64{205, 264, 278, 300, 322, 342, 362},
		},
	}
	return makeTabled(rows)
})

func makeTabled(rows []tabled) []Solid {
	solids := make([]Solid, len(rows))
	for i, r := range rows {
		solids[i] = table(material{
			name: r.name, synonyms: r.synonyms, density: r.density, source: r.class.source + r.status + interpolated,
			caution: r.class.caution, uncertainty: r.class.uncertainty,
		}, r.t, r.k, r.c)
	}
	return solids
}

// A plain solid has constant properties.
type plain struct {
	name     string
	synonyms []string
	density  float64 // kg/m³
	c        float64 // J/(kg K)
	k        float64 // W/(m K)
	status   string
}

func makePlain(of *class, rows []plain) []Solid {
	solids := make([]Solid, len(rows))
	for i, r := range rows {
		solids[i] = newSolid(material{
			name: r.name, synonyms: r.synonyms, density: r.density, source: of.source + r.status, caution: of.caution,
			low: of.low, high: of.high, constant: true, curve: property.Constant{K: r.k, C: r.c}, uncertainty: of.uncertainty,
		})
	}
	return solids
}

// A span solid has constant properties of which some are known by their limits.
type span struct {
	name                string
	synonyms            []string
	densityMin, density float64
	c                   float64
	kMin, kMax          float64
}

// makeSpans takes the middle of the limits; their half distance adds to the uncertainty of the class.
func makeSpans(of *class, rows []span) []Solid {
	solids := make([]Solid, len(rows))
	for i, r := range rows {
		rho, k := (r.densityMin+r.density)/2, (r.kMin+r.kMax)/2
		u := of.uncertainty
		u.density += (r.density - r.densityMin) / 2 / rho
		u.conductivity += (r.kMax - r.kMin) / 2 / k
		solids[i] = newSolid(material{
			name: r.name, synonyms: r.synonyms, density: rho, source: of.source + recalled, caution: of.caution,
			low: of.low, high: of.high, constant: true, curve: property.Constant{K: k, C: r.c}, uncertainty: u,
		})
	}
	return solids
}
