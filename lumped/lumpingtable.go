package lumped

import "math"

//go:generate go run ../internal/lumpgen

// The bodies and the places of the table of lumping errors.
const (
	inPlate = iota
	inCylinder
	inSphere
	bodiesOfTable
)

const (
	atCentre = iota
	atSurface
	ofMean
	placesOfTable
)

// tableMargin is more than the interpolation can miss; the tests show a hundredth of that.
const tableMargin = 1.01

// tabulatedBound returns a bound on the largest |θ_exact − θ_lumped| over all time: the table times Bi/(1 + Bi),
// with a cubic through four points over the logarithm of Bi. Below the table the error goes with Bi; above it
// is 1 at the most.
func tabulatedBound(body, place int, bi float64) float64 {
	row := &lumpingErrors[body][place]
	switch {
	case bi <= tableFirst:
		return min(1, tableMargin*row[0]*bi)
	case bi > tableLast:
		return 1
	}
	at := perDecade * (math.Log10(bi) - math.Log10(tableFirst))
	i := min(max(int(at)-1, 0), tableLength-4)
	x := at - float64(i)
	a, b, c, d := x, x-1, x-2, x-3
	value := -b*c*d/6*row[i] + a*c*d/2*row[i+1] - a*b*d/2*row[i+2] + a*b*c/6*row[i+3]
	return min(1, tableMargin*value*bi/(1+bi))
}

// biotOfTable returns the Biot number of a point of the table.
func biotOfTable(i int) float64 { return tableFirst * math.Pow(10, float64(i)/perDecade) }
