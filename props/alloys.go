package props

import "sync"

// technicalAlloys returns alloys of which only values near room temperature are known.
var technicalAlloys = sync.OnceValue(func() []Solid {
	return makeSpans(&class{
		source: "values near 20 °C to 25 °C as in handbooks of metals and data sheets, middle of the range of grades and tempers, held constant, ",
		low:    celsius(0), high: celsius(100),
		uncertainty: solidUncertainty{
			density: 0.02, specificHeat: 0.10, conductivity: 0.10,
			source: "our own estimate: half the range of grades and tempers, and 10 % of the conductivity for the change to 100 °C" + noExpansion,
		},
	}, []span{
		{"aluminium alloy 6061", []string{"AlMg1SiCu"}, 2700, 2700, 896, 155, 170},
		{"aluminium alloy 6063", []string{"AlMg0.7Si"}, 2690, 2690, 900, 200, 210},
		{"aluminium alloy 7075", []string{"AlZn5.5MgCu"}, 2810, 2810, 960, 125, 135},
		{"cast aluminium alloy A356", []string{"AlSi7Mg"}, 2670, 2670, 963, 150, 160},
		{"grey cast iron", []string{"lamellar graphite iron"}, 7150, 7150, 490, 42, 55},
		{"ductile cast iron", []string{"nodular graphite iron"}, 7100, 7100, 500, 30, 38},
		{"tool steel H13", []string{"hot-work tool steel"}, 7760, 7760, 460, 24, 29},
		{"steel AISI 4140", []string{"42CrMo4"}, 7850, 7850, 473, 42, 45},
		{"bearing steel AISI 52100", []string{"100Cr6"}, 7810, 7810, 475, 40, 47},
		{"stainless steel AISI 410", []string{"martensitic stainless steel", "1.4006"}, 7740, 7740, 460, 24, 26},
		{"stainless steel AISI 430", []string{"1.4016"}, 7750, 7750, 460, 24, 26},
		{"duplex stainless steel 2205", []string{"1.4462"}, 7800, 7800, 480, 14, 19},
		{"titanium alloy Ti-6Al-4V", []string{"titanium grade 5"}, 4430, 4430, 560, 6.6, 7.3},
		{"nickel alloy N06600", []string{"NiCr15Fe8"}, 8470, 8470, 444, 14.5, 15.5},
		{"nickel alloy N07718", []string{"NiCr19Fe19Nb5Mo3"}, 8190, 8190, 435, 11, 11.5},
		{"nickel alloy N10276", []string{"NiMo16Cr15W"}, 8890, 8890, 427, 10, 10.5},
		{"nickel-copper alloy N04400", []string{"NiCu30Fe"}, 8800, 8800, 427, 21.5, 22.5},
		{"oxygen-free copper C10100", []string{"Cu-OFE"}, 8940, 8940, 385, 390, 401},
		{"beryllium copper C17200", []string{"CuBe2"}, 8250, 8250, 420, 105, 130},
		{"aluminium bronze C95400", []string{"CuAl11Fe4"}, 7450, 7450, 420, 55, 60},
		{"tin-lead solder 63Sn-37Pb", []string{"Sn63Pb37"}, 8400, 8400, 170, 50, 51},
		{"lead-free solder 96.5Sn-3Ag-0.5Cu", []string{"SAC305"}, 7400, 7400, 230, 58, 60},
		{"zinc die-casting alloy ZnAl4", []string{"ZL0400"}, 6600, 6600, 419, 110, 115},
		{"magnesium alloy AZ31B", []string{"MgAl3Zn1"}, 1770, 1770, 1050, 76, 96},
		{"cemented carbide 6 % Co", []string{"hard metal"}, 14900, 14900, 210, 80, 110},
	})
})
