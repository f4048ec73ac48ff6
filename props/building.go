package props

import (
	"slices"
	"sync"
)

const iso10456 = "EN ISO 10456:2007, table 3, design values at 10 °C to 23 °C, held constant, "

const quotedISO = "; rows that are marked as read were read on a page that quotes the draft prEN 12524:1998"

// designValue returns a class of EN ISO 10456.
func designValue(low, high, density, specificHeat, conductivity float64, scatter string) *class {
	return &class{source: iso10456, low: celsius(low), high: celsius(high), uncertainty: solidUncertainty{
		density: density, specificHeat: specificHeat, conductivity: conductivity,
		source: "our own estimate: " + scatter + "; the range is our own judgement" + quotedISO,
	}}
}

// buildingMaterials returns the design values of EN ISO 10456. Where the standard gives a range of the density (soils,
// basalt, gneiss, foam rubber) it is the middle.
var buildingMaterials = sync.OnceValue(func() []Solid {
	return slices.Concat(
		makePlain(designValue(-20, 60, 0.10, 0.25, 0.25, "the table rounds most specific heats to 1000 J/(kg K), dry rock and mortar have 750 to 1000; else between products of the density, with the moisture of a building in use; more moisture conducts more"), []plain{
			{"asphalt", nil, 2100, 1000, 0.7, recalled},
			{"design concrete, 1800 kg/m³", nil, 1800, 1000, 1.15, recalled},
			{"design concrete, 2000 kg/m³", nil, 2000, 1000, 1.35, recalled},
			{"design concrete, 2200 kg/m³", nil, 2200, 1000, 1.65, recalled},
			{"design concrete, 2400 kg/m³", nil, 2400, 1000, 2, recalled},
			{"reinforced concrete, 1 % steel", nil, 2300, 1000, 2.3, recalled},
			{"reinforced concrete, 2 % steel", nil, 2400, 1000, 2.5, recalled},
			{"quartz glass", []string{"fused quartz"}, 2200, 750, 1.4, recalled},
			{"glass mosaic", nil, 2000, 750, 1.2, recalled},
			{"gypsum, 600 kg/m³", nil, 600, 1000, 0.18, recalled},
			{"gypsum, 900 kg/m³", nil, 900, 1000, 0.3, recalled},
			{"gypsum, 1200 kg/m³", nil, 1200, 1000, 0.43, recalled},
			{"gypsum, 1500 kg/m³", nil, 1500, 1000, 0.56, recalled},
			{"plasterboard, 700 kg/m³", []string{"drywall"}, 700, 1000, 0.21, recalled},
			{"plasterboard, 900 kg/m³", nil, 900, 1000, 0.25, recalled},
			{"gypsum insulating plaster", nil, 600, 1000, 0.18, recalled},
			{"gypsum plaster, 1000 kg/m³", nil, 1000, 1000, 0.4, recalled},
			{"gypsum plaster, 1300 kg/m³", nil, 1300, 1000, 0.57, recalled},
			{"gypsum and sand plaster", nil, 1600, 1000, 0.8, recalled},
			{"lime and sand render", nil, 1600, 1000, 0.8, recalled},
			{"cement and sand render", []string{"cement mortar"}, 1800, 1000, 1, recalled},
			{"crystalline stone", nil, 2800, 1000, 3.5, recalled},
			{"sedimentary stone", nil, 2600, 1000, 2.3, recalled},
			{"light sedimentary stone", nil, 1500, 1000, 0.85, recalled},
			{"porous stone", nil, 1600, 1000, 0.55, recalled},
			{"basalt", nil, 2850, 1000, 3.5, recalled},
			{"gneiss", nil, 2550, 1000, 3.5, recalled},
			{"granite", nil, 2600, 1000, 2.8, recalled},
			{"marble", nil, 2800, 1000, 3.5, recalled},
			{"slate", nil, 2400, 1000, 2.2, recalled},
			{"extra soft limestone", nil, 1600, 1000, 0.85, recalled},
			{"soft limestone", nil, 1800, 1000, 1.1, recalled},
			{"semi-hard limestone", nil, 2000, 1000, 1.4, recalled},
			{"hard limestone", nil, 2200, 1000, 1.7, recalled},
			{"extra hard limestone", nil, 2600, 1000, 2.3, recalled},
			{"sandstone", nil, 2600, 1000, 2.3, recalled},
			{"natural pumice", nil, 400, 1000, 0.12, recalled},
			{"artificial stone", nil, 1750, 1000, 1.3, recalled},
			{"clay roof tile", nil, 2000, 800, 1, recalled},
			{"concrete roof tile", nil, 2100, 1000, 1.5, recalled},
			{"ceramic tile", []string{"porcelain tile"}, 2300, 840, 1.3, recalled},
		}),
		makePlain(designValue(0, 60, 0.07, 0.25, 0.30, "between products, fillers and crystallinity"), []plain{
			{"bitumen", []string{"asphalt binder"}, 1050, 1000, 0.17, recalled},
			{"bitumen felt", nil, 1100, 1000, 0.23, recalled},
			{"plastic flooring", nil, 1700, 1400, 0.25, recalled},
			{"linoleum", nil, 1200, 1400, 0.17, recalled},
			{"acrylic", nil, 1050, 1500, 0.2, read},
			{"polycarbonate", []string{"PC"}, 1200, 1200, 0.2, read},
			{"PTFE", []string{"polytetrafluoroethylene"}, 2200, 1000, 0.25, recalled},
			{"PMMA", []string{"polymethyl methacrylate", "acrylic glass"}, 1180, 1500, 0.18, read},
			{"acetal", []string{"polyoxymethylene", "POM"}, 1410, 1400, 0.3, recalled},
			{"polyamide", []string{"nylon", "PA"}, 1150, 1600, 0.25, read},
			{"polyamide 66, 25 % glass fibre", nil, 1450, 1600, 0.3, read},
			{"high-density polyethylene", []string{"HDPE", "polyethylene HD"}, 980, 1800, 0.5, recalled},
			{"low-density polyethylene", []string{"LDPE", "polyethylene LD"}, 920, 2200, 0.33, recalled},
			{"polystyrene", []string{"PS"}, 1050, 1300, 0.16, recalled},
			{"polypropylene", []string{"PP"}, 910, 1800, 0.22, recalled},
			{"polypropylene, 25 % glass fibre", nil, 1200, 1800, 0.25, recalled},
			{"polyurethane", []string{"PU"}, 1200, 1800, 0.25, recalled},
			{"epoxy resin", []string{"epoxy"}, 1200, 1400, 0.2, recalled},
			{"phenolic resin", []string{"phenol formaldehyde"}, 1300, 1700, 0.3, recalled},
			{"polyester resin", []string{"thermosetting polyester"}, 1400, 1200, 0.19, recalled},
		}),
		makePlain(designValue(0, 60, 0.15, 0.40, 0.35, "between mixtures; the specific heat of several rubbers in the table is that of filled ones"), []plain{
			{"rubber flooring", nil, 1200, 1400, 0.17, recalled},
			{"carpet", nil, 200, 1300, 0.06, recalled},
			{"natural rubber", []string{"NR"}, 910, 1100, 0.13, recalled},
			{"polychloroprene rubber", []string{"CR", "chloroprene"}, 1240, 2140, 0.23, recalled},
			{"butyl rubber", []string{"IIR"}, 1200, 1400, 0.24, recalled},
			{"foam rubber", nil, 70, 1500, 0.06, recalled},
			{"hard rubber", []string{"ebonite"}, 1200, 1400, 0.17, recalled},
			{"EPDM", []string{"ethylene propylene rubber"}, 1150, 1000, 0.25, recalled},
			{"polyisobutylene", []string{"PIB"}, 930, 1100, 0.2, recalled},
			{"polysulfide", nil, 1700, 1000, 0.4, recalled},
			{"butadiene rubber", nil, 980, 1000, 0.25, recalled},
			{"silicone", []string{"silicone rubber"}, 1200, 1000, 0.35, recalled},
			{"filled silicone", nil, 1450, 1000, 0.5, recalled},
			{"silicone foam", nil, 750, 1000, 0.12, recalled},
			{"elastomeric foam", []string{"flexible pipe insulation"}, 70, 1500, 0.05, recalled},
			{"polyurethane sealing foam", nil, 70, 1500, 0.05, recalled},
			{"polyethylene foam", nil, 70, 2300, 0.05, recalled},
		}),
		makePlain(designValue(-20, 60, 0.15, 0.25, 0.25, "between products and species, air-dry, across the grain; along the grain wood conducts about twice as much"), []plain{
			{"cork underlay", nil, 200, 1500, 0.05, recalled},
			{"timber, 450 kg/m³", nil, 450, 1600, 0.12, recalled},
			{"timber, 700 kg/m³", nil, 700, 1600, 0.18, read},
			{"plywood, 300 kg/m³", nil, 300, 1600, 0.09, recalled},
			{"plywood, 500 kg/m³", nil, 500, 1600, 0.13, recalled},
			{"plywood, 700 kg/m³", nil, 700, 1600, 0.17, recalled},
			{"plywood, 1000 kg/m³", nil, 1000, 1600, 0.24, recalled},
			{"cement-bonded particleboard", nil, 1200, 1500, 0.23, recalled},
			{"particleboard, 300 kg/m³", nil, 300, 1700, 0.1, recalled},
			{"particleboard, 600 kg/m³", nil, 600, 1700, 0.14, recalled},
			{"particleboard, 900 kg/m³", nil, 900, 1700, 0.18, recalled},
			{"OSB", []string{"oriented strand board"}, 650, 1700, 0.13, recalled},
			{"fibreboard, 250 kg/m³", nil, 250, 1700, 0.07, recalled},
			{"fibreboard, 400 kg/m³", nil, 400, 1700, 0.1, recalled},
			{"fibreboard, 600 kg/m³", nil, 600, 1700, 0.14, recalled},
			{"fibreboard, 800 kg/m³", nil, 800, 1700, 0.18, recalled},
		}),
		makePlain(designValue(-30, 0, 0.20, 0.10, 0.45, "the structure of the snow, and its age"), []plain{
			{"fresh snow", nil, 100, 2000, 0.05, recalled},
			{"soft snow", nil, 200, 2000, 0.12, recalled},
			{"slightly compacted snow", nil, 300, 2000, 0.23, recalled},
			{"compacted snow", nil, 500, 2000, 0.6, recalled},
		}),
		makePlain(designValue(0, 100, 0.05, 0.12, 0.25, "between the alloys of the name"), []plain{
			{"aluminium alloy", []string{"aluminium alloys"}, 2800, 880, 160, read},
			{"bronze", nil, 8700, 380, 65, recalled},
			{"brass", nil, 8400, 380, 120, read},
			{"cast iron", []string{"iron castings"}, 7500, 450, 50, recalled},
			{"ferritic stainless steel", nil, 7900, 460, 30, recalled},
		}),
		makePlain(designValue(1, 40, 0.20, 0.35, 0.45, "soil and moisture; frozen ground is another material"), []plain{
			{"clay or silt soil", nil, 1500, 2085, 1.5, recalled},
			{"sand or gravel soil", nil, 1950, 1045, 2, recalled},
		}),
	)
})
