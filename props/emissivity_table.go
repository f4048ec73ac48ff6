package props

import (
	"math"
	"sync"
)

// The sources of the emissivities.
const (
	manual   = "tables in the manual of a radiation thermometer, total spectrum, read on copies"
	tables   = "table of total normal emissivities of an engineering site, read"
	longWave = "table in the manual of a radiation thermometer, long-wave band, read on a copy"
	memory   = "F. P. Incropera et al., Fundamentals of Heat and Mass Transfer, 6th ed., table A.11, and common handbooks, from memory"
)

var none = math.NaN()

type surfaceRow struct {
	surface     string
	from, to    float64 // °C
	least, most float64
	source      string
}

var surfaceRows = sync.OnceValue(func() []surfaceRow {
	return []surfaceRow{
		{"aluminium polished", 50, 100, 0.04, 0.06, manual},
		{"aluminium commercial sheet", 100, 100, 0.09, 0.09, manual + "; " + tables},
		{"aluminium rough", 20, 50, 0.06, 0.07, manual},
		{"aluminium strongly oxidised", 50, 500, 0.2, 0.31, manual + "; " + tables},
		{"aluminium anodised", 100, 100, 0.55, 0.55, manual},
		{"aluminium anodised (spacecraft type)", 20, 20, 0.84, 0.84, tables},
		{"brass dull tarnished", 20, 350, 0.22, 0.22, manual},
		{"brass oxidised", 100, 100, 0.61, 0.61, manual},
		{"brass highly polished", none, none, 0.03, 0.03, longWave},
		{"bronze polished", 50, 50, 0.1, 0.1, manual},
		{"chromium polished", 50, 50, 0.1, 0.1, manual},
		{"chromium polished", 500, 1000, 0.28, 0.38, manual},
		{"copper polished", 50, 100, 0.02, 0.03, manual},
		{"copper commercial burnished", 20, 20, 0.07, 0.07, manual},
		{"copper oxidised", 50, 50, 0.6, 0.7, manual},
		{"copper oxidised black", 20, 27, 0.78, 0.88, manual},
		{"gold polished", 130, 130, 0.018, 0.018, manual},
		{"iron/steel electrolytic", 22, 100, 0.05, 0.05, manual},
		{"steel polished", 100, 100, 0.07, 0.07, manual},
		{"steel polished", 400, 1000, 0.14, 0.38, manual},
		{"steel freshly rolled", 20, 20, 0.24, 0.24, manual},
		{"steel rolled sheet", 50, 50, 0.56, 0.56, manual},
		{"steel hot rolled", 20, 130, 0.6, 0.77, manual},
		{"steel oxidised", 100, 100, 0.74, 0.74, manual},
		{"steel oxidised", 200, 600, 0.78, 0.82, manual},
		{"steel rough plane", 50, 50, 0.95, 0.98, manual},
		{"steel rusted red", 20, 22, 0.61, 0.85, manual},
		{"steel galvanised bright", 25, 25, 0.23, 0.28, memory},
		{"stainless steel clean", 25, 100, 0.15, 0.25, memory},
		{"stainless steel oxidised at 800 °C", none, none, 0.85, 0.85, longWave},
		{"cast iron polished", none, none, 0.21, 0.21, longWave},
		{"cast iron oxidised", none, none, 0.64, 0.64, longWave},
		{"nickel polished", 25, 100, 0.05, 0.09, memory},
		{"nickel oxidised", 300, 1000, 0.4, 0.6, memory},
		{"titanium polished", 200, 200, 0.15, 0.15, memory},
		{"titanium oxidised", 200, 500, 0.4, 0.6, memory},
		{"silver polished", 25, 200, 0.02, 0.03, memory},
		{"tungsten filament", 2000, 3000, 0.25, 0.35, memory},
		{"brick red", 20, 20, 0.93, 0.93, longWave},
		{"concrete", 20, 20, 0.92, 0.92, manual},
		{"plaster rough", none, none, 0.91, 0.91, longWave},
		{"clay fired", 70, 70, 0.91, 0.91, manual},
		{"glass", 20, 100, 0.85, 0.95, memory},
		{"glass polished plate", none, none, 0.94, 0.94, longWave},
		{"granite polished", 20, 20, 0.849, 0.849, manual + ", 6.5 µm to 20 µm"},
		{"asphalt paving", 4, 4, 0.967, 0.967, manual + ", 6.5 µm to 20 µm"},
		{"carbon soot", 20, 20, 0.95, 0.95, manual},
		{"lampblack", 20, 400, 0.95, 0.97, manual},
		{"graphite filed", 20, 20, 0.98, 0.98, manual},
		{"cloth black", 20, 20, 0.98, 0.98, manual},
		{"paper white bond", none, none, 0.93, 0.93, longWave},
		{"paint oil any colour", none, none, 0.92, 0.96, longWave + "; " + memory},
		{"paint aluminium", 20, 100, 0.27, 0.67, memory},
		{"lacquer matt black", 40, 100, 0.96, 0.98, memory},
		{"wood planed oak", 20, 20, 0.9, 0.9, longWave},
		{"rubber black", 20, 20, 0.86, 0.95, memory},
		{"plastics", 20, 20, 0.85, 0.95, memory},
		{"human skin", 32, 32, 0.97, 0.98, longWave},
		{"water", 20, 20, 0.95, 0.963, memory + "; a long-wave table lists 0.96 for distilled water, and 0.67, which is wrong for total emission"},
		{"ice smooth", 0, 0, 0.96, 0.97, longWave},
		{"snow", 0, 0, 0.82, 0.9, longWave},
		{"soil dry", none, none, 0.92, 0.92, longWave},
		{"soil wet", none, none, 0.95, 0.95, longWave},
		{"sand", none, none, 0.76, 0.9, longWave + "; " + memory},
		{"vegetation", 20, 20, 0.92, 0.98, memory},
	}
})
