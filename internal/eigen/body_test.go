package eigen

// A body is what the tests below know of each of the three.
type body struct {
	name         string
	dimension    float64 // volume of the unit body grows with x^dimension
	new          func(bi float64) Solution
	root         func(n int, bi float64) float64
	coefficients func(bi, zeta float64) (c, surface, mean float64)
	early        func(bi, x, fo float64) float64
	earlySurface func(bi, fo float64) float64
	earlyLoss    func(bi, fo float64) float64
	join         float64
	terms        int
}

var bodies = []body{
	{
		"plate", 1, func(bi float64) Solution { return NewPlate(bi) }, plateRoot, plateCoefficients,
		plateEarly, plateEarlySurface, plateEarlyLoss, Join, Terms,
	},
	{
		"cylinder", 2, func(bi float64) Solution { return NewCylinder(bi) }, cylinderRoot, cylinderCoefficients,
		cylinderEarly, cylinderEarlySurface, cylinderEarlyLoss, CylinderJoin, CylinderTerms,
	},
	{
		"sphere", 3, func(bi float64) Solution { return NewSphere(bi) },
		func(n int, bi float64) float64 { zeta, _ := sphereRoot(n, bi); return zeta },
		func(bi, zeta float64) (c, surface, mean float64) { return sphereCoefficients(bi, zeta*zeta) },
		sphereEarly, sphereEarlySurface, sphereEarlyLoss, Join, Terms,
	},
}
