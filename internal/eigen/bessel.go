package eigen

import (
	"math"
	"sync"
)

// J0 about one point of a grid of step 1/2, by Taylor's series, whose terms follow from Bessel's equation: with
// J0(c + r) = Σ a_n r^n, z y” + y' + z y = 0 gives c (n+1)(n+2) a_{n+2} = −(n+1)² a_{n+1} − c a_n − a_{n−1}. With
// |r| ≤ 1/4 the first term left out is below 0.25^13/13! = 2e-18.
const (
	besselOrder = 13
	besselStep  = 0.5
	besselEnd   = 136
	besselLast  = besselEnd / besselStep
)

// A besselTable holds the factors of r^n of J0 and of J1 about each point.
type besselTable [besselLast + 1]struct {
	j0 [besselOrder]float64
	j1 [besselOrder - 1]float64
}

// bessel returns the table, which is made when it is first asked for.
var bessel = sync.OnceValue(func() *besselTable {
	table := new(besselTable)
	for n, term := 0, 1.0; n < besselOrder; n += 2 {
		table[0].j0[n] = term
		term *= -0.25 / float64((n/2+1)*(n/2+1))
	}
	for i := 1; i < len(table); i++ {
		c, a := float64(i)*besselStep, &table[i].j0
		a[0], a[1] = math.J0(c), -math.J1(c)
		before := 0.0
		for n := range besselOrder - 2 {
			m := float64(n + 1)
			a[n+2] = -(m*m*a[n+1] + c*a[n] + before) / (c * m * (m + 1))
			before = a[n]
		}
	}
	for i := range table {
		for n := range table[i].j1 {
			table[i].j1[n] = -float64(n+1) * table[i].j0[n+1]
		}
	}
	return table
})

// bessel0 returns J0(z) with an absolute error of 3e-16.
func bessel0(table *besselTable, z float64) float64 {
	if !(z >= 0 && z < besselEnd) {
		return math.J0(z)
	}
	i := uint(z*(1/besselStep) + 0.5)
	r, a := z-float64(i)*besselStep, &table[i].j0
	return head(a, r) + r*r*r*r*tail(a, r)
}

// head returns Σ a_n r^n up to n = 3, and tail Σ a_n r^{n−4} from n = 4 on; both are put in line by the compiler.
func head(a *[besselOrder]float64, r float64) float64 {
	return (a[0] + r*a[1]) + r*r*(a[2]+r*a[3])
}

func tail(a *[besselOrder]float64, r float64) float64 {
	s := r * r
	return ((a[4] + r*a[5]) + s*(a[6]+r*a[7])) + s*s*(((a[8]+r*a[9])+s*(a[10]+r*a[11]))+s*s*a[12])
}

// bessel0At is bessel0 of the one table.
func bessel0At(z float64) float64 { return bessel0(bessel(), z) }

// bessel01 returns J0(z) and J1(z).
func bessel01(z float64) (j0, j1 float64) {
	if !(z >= 0 && z < besselEnd) {
		return math.J0(z), math.J1(z)
	}
	i := uint(z*(1/besselStep) + 0.5)
	row := &bessel()[i]
	r, a, b := z-float64(i)*besselStep, &row.j0, &row.j1
	s := r * r
	q := s * s
	j0 = head(a, r) + q*tail(a, r)
	j1 = ((b[0] + r*b[1]) + s*(b[2]+r*b[3])) + q*(((b[4]+r*b[5])+s*(b[6]+r*b[7]))+q*((b[8]+r*b[9])+s*(b[10]+r*b[11])))
	return j0, j1
}
