package props

import (
	"strconv"
	"sync"

	"example.com/coolward/internal/property"
)

// soils returns moist sand and clay by density and moisture.
var soils = sync.OnceValue(func() []Solid {
	const dryHeat = 800.0 // J/(kg K)
	rows := []struct {
		name                   string
		dry, moisture, low, up float64 // kg/m³, % of the dry mass, W/(m K)
	}{
		{"sand", 1900, 5, 2.1, 3.3},
		{"sand", 1900, 10, 2.4, 3.5},
		{"sand", 1900, 15, 2.8, 3.8},
		{"sand", 1600, 5, 1.4, 2.4},
		{"sand", 1600, 10, 2.1, 2.6},
		{"sand", 1600, 15, 2.3, 2.8},
		{"sand", 1600, 20, 2.4, 2.9},
		{"sand", 1300, 5, 0.9, 1.9},
		{"sand", 1300, 10, 1, 1.9},
		{"sand", 1300, 15, 1, 2.1},
		{"sand", 1300, 20, 1.2, 2.1},
		{"clay", 1900, 5, 1, 1.4},
		{"clay", 1900, 10, 1, 1.4},
		{"clay", 1900, 15, 1.4, 1.9},
		{"clay", 1600, 5, 0.9, 1},
		{"clay", 1600, 10, 0.9, 1},
		{"clay", 1600, 15, 1, 1.2},
		{"clay", 1600, 20, 1, 1.4},
		{"clay", 1300, 5, 0.5, 0.9},
		{"clay", 1300, 10, 0.6, 0.9},
		{"clay", 1300, 15, 0.7, 0.95},
		{"clay", 1300, 20, 0.7, 1},
	}
	solids := make([]Solid, len(rows))
	for i, r := range rows {
		w := r.moisture / 100
		k := (r.low + r.up) / 2
		solids[i] = newSolid(material{
			name: r.name + ", " + strconv.FormatFloat(r.dry, 'g', -1, 64) + " kg/m³ dry, " + strconv.FormatFloat(r.moisture, 'g', -1, 64) + " % moisture",
			source: "O. T. Farouki, CRREL Report 82-8 (1982), range of the conductivity over five methods, read as quoted on a page, middle of the range; specific heat: " +
				"800 J/(kg K) of dry sand (Incropera et al., 6th ed., table A.3, from memory) and the water by mass",
			density: r.dry * (1 + w), low: celsius(1), high: celsius(40), constant: true,
			curve: property.Constant{K: k, C: (dryHeat + w*property.WaterHeat) / (1 + w)},
			uncertainty: solidUncertainty{
				density: 0.05, specificHeat: 0.15, conductivity: 0.05 + (r.up-r.low)/2/k,
				source: "conductivity: half the range over the five methods; the others our own estimate; unfrozen ground, moisture by mass of dry soil",
			},
		})
	}
	return solids
})
