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
		value2(plateEarly), value1(plateEarlySurface), plateEarlyLoss, Join, Terms,
	},
	{
		"cylinder", 2, func(bi float64) Solution { return NewCylinder(bi) }, cylinderRoot, cylinderCoefficients,
		value2(cylinderEarly), value1(cylinderEarlySurface), cylinderEarlyLoss, CylinderJoin, CylinderTerms,
	},
	{
		"sphere", 3, func(bi float64) Solution { return NewSphere(bi) },
		func(n int, bi float64) float64 { zeta, _ := sphereRoot(n, bi); return zeta },
		func(bi, zeta float64) (c, surface, mean float64) { return sphereCoefficients(bi, zeta*zeta) },
		value2(sphereEarly), value1(sphereEarlySurface), sphereEarlyLoss, Join, Terms,
	},
}

// value1 and value2 leave the derivative out.
func value1(f func(bi, fo float64) (float64, float64)) func(bi, fo float64) float64 {
	return func(bi, fo float64) float64 { v, _ := f(bi, fo); return v }
}

func value2(f func(bi, x, fo float64) (float64, float64)) func(bi, x, fo float64) float64 {
	return func(bi, x, fo float64) float64 { v, _ := f(bi, x, fo); return v }
}
