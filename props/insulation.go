package props

import (
	"slices"
	"sync"
)

const insulationSource = "range of products within the European standards of thermal insulation (EN 13162 to EN 13171), middle of the range, specific heat as in EN ISO 10456, "

// insulation returns insulation materials.
var insulation = sync.OnceValue(func() []Solid {
	estimate := solidUncertainty{
		density: 0.05, specificHeat: 0.15, conductivity: 0.12,
		source: "half the range between products, and 12 % of the conductivity for its rise of 0.3 % to 0.6 % per kelvin over the range: our own estimate; dry material",
	}
	return slices.Concat(
		makeSpans(&class{
			source: "at a mean temperature of 10 °C, " + insulationSource, low: celsius(-10), high: celsius(40), uncertainty: estimate,
		}, []span{
			{"glass wool", nil, 10, 80, 1030, 0.03, 0.045},
			{"rock wool", nil, 30, 180, 1030, 0.033, 0.042},
			{"EPS", []string{"expanded polystyrene"}, 10, 35, 1450, 0.03, 0.04},
			{"XPS", []string{"extruded polystyrene foam"}, 25, 45, 1450, 0.028, 0.037},
			{"polyurethane foam", []string{"PUR", "PIR", "polyisocyanurate foam"}, 28, 55, 1400, 0.021, 0.03},
			{"phenolic foam", nil, 30, 60, 1400, 0.018, 0.024},
			{"cellular glass", nil, 100, 165, 1000, 0.036, 0.05},
			{"expanded perlite board", nil, 130, 180, 900, 0.045, 0.06},
			{"loose expanded vermiculite", nil, 60, 120, 1080, 0.058, 0.07},
			{"silica aerogel blanket", nil, 130, 200, 1000, 0.013, 0.021},
			{"vacuum insulation panel", nil, 170, 250, 800, 0.003, 0.008},
			{"expanded cork board", nil, 90, 160, 1560, 0.036, 0.045},
			{"wood fibre board", nil, 50, 250, 2000, 0.036, 0.05},
			{"loose cellulose", nil, 28, 65, 1600, 0.035, 0.042},
			{"sheep wool", nil, 15, 60, 1300, 0.035, 0.045},
		}),
		makeSpans(&class{
			source: "at a mean temperature of 200 °C, " + insulationSource, low: celsius(150), high: celsius(250), uncertainty: estimate,
		}, []span{
			{"calcium silicate board", nil, 200, 300, 1000, 0.06, 0.08},
			{"microporous silica", nil, 200, 300, 900, 0.02, 0.025},
		}),
		makeSpans(&class{
			source: "at a mean temperature of 400 °C, range of products, middle of the range, ", low: celsius(350), high: celsius(450), uncertainty: estimate,
		}, []span{
			{"insulating fire brick", nil, 480, 600, 1000, 0.13, 0.18},
		}),
		makeTabled([]tabled{{
			"ceramic fibre blanket", nil, 112, &class{
				source: "mean temperatures of 400 °C and 800 °C, range of products from 64 kg/m³ to 160 kg/m³, middle of the range, ",
				uncertainty: solidUncertainty{
					density: 0.45, specificHeat: 0.15, conductivity: 0.45,
					source: "half the range between products: our own estimate; a dense blanket conducts less than a light one",
				},
			}, recalled, []float64{celsius(400), celsius(800)}, []float64{0.115, 0.255}, []float64{1000, 1130},
		}}),
	)
})
