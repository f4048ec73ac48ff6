package props

import "sync"

const medicalCaution = "Values between persons differ more than the uncertainty; what is done to a person is decided by licensed medical practice, not by this number."

// tissues returns human tissue.
var tissues = sync.OnceValue(func() []Solid {
	return makePlain(&class{
		source: "averages as compiled by R. L. McIntosh, V. Anderson, Biophys. Rev. Lett. 5 (2010) 129, and the databases built on it, at 37 °C, held constant, without the blood flow, ",
		low:    celsius(20), high: celsius(45), caution: medicalCaution,
		uncertainty: solidUncertainty{
			density: 0.05, specificHeat: 0.15, conductivity: 0.25,
			source: "scatter between sources, 10 % to 30 % for the conductivity: our own estimate",
		},
	}, []plain{
		{"human skin", nil, 1109, 3391, 0.37, recalled},
		{"subcutaneous fat", []string{"adipose tissue"}, 911, 2348, 0.21, recalled},
		{"skeletal muscle", nil, 1090, 3421, 0.49, recalled},
		{"whole blood", nil, 1050, 3617, 0.52, recalled},
		{"cortical bone", nil, 1908, 1313, 0.32, recalled},
		{"cancellous bone", nil, 1178, 2274, 0.31, recalled},
		{"grey matter", nil, 1045, 3696, 0.55, recalled},
		{"white matter", nil, 1041, 3583, 0.48, recalled},
		{"human liver", nil, 1079, 3540, 0.52, recalled},
		{"kidney", nil, 1066, 3763, 0.53, recalled},
		{"heart muscle", nil, 1081, 3686, 0.56, recalled},
		{"inflated lung", nil, 394, 3886, 0.39, recalled},
		{"tendon", []string{"ligament"}, 1142, 3432, 0.47, recalled},
		{"vitreous body", nil, 1005, 4047, 0.59, recalled},
		{"cornea", nil, 1051, 3615, 0.54, recalled},
	})
})
