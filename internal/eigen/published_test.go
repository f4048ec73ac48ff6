package eigen

import (
	"math"
	"testing"
)

// The tolerance is half a unit of the last printed digit, or a whole one where the table does not round
// to the nearest. At Bi = 1 the equation is cot ζ = 0: ζ_1 = π/2 and C_1 = 4/π, exactly.
func TestSpherePublished(t *testing.T) {
	const (
		cengel     = "Y. A. Çengel, Heat and Mass Transfer, 6th ed., table 4-2"
		essentials = "Essentials of Applied Mathematics for Scientists and Engineers (2007), appendix A, table A.2 with C = Bi − 1"
		ashrae     = "ASHRAE Handbook, Refrigeration, lag factor j of a sphere for Bi to infinity (from memory)"
	)
	for _, c := range []struct {
		what      string
		bi        float64
		n         int
		c         bool // the coefficient rather than the root
		want      float64
		tolerance float64
		source    string
	}{
		{"ζ_1", 1, 1, false, math.Pi / 2, 1e-15, "exact"},
		{"C_1", 1, 1, true, 4 / math.Pi, 1e-15, "exact"},
		{"ζ_3", 1, 3, false, 5 * math.Pi / 2, 1e-14, "exact"},
		{"ζ_1", 1, 1, false, 1.5708, 5e-5, cengel},
		{"C_1", 1, 1, true, 1.2732, 5e-5, cengel},
		{"ζ_1", 0.1, 1, false, 0.5423, 5e-5, cengel},
		{"C_1", 0.1, 1, true, 1.0298, 5e-5, cengel},
		{"ζ_1", 2, 1, false, 2.0288, 5e-5, essentials},
		{"ζ_2", 2, 2, false, 4.9132, 5e-5, essentials},
		{"ζ_3", 2, 3, false, 7.9787, 5e-5, essentials},
		// The table rounds these two up: the roots are 11.08554 and 14.20744.
		{"ζ_4", 2, 4, false, 11.0856, 1e-4, essentials},
		{"ζ_5", 2, 5, false, 14.2075, 1e-4, essentials},
		{"ζ_6", 2, 6, false, 17.3364, 5e-5, essentials},
		{"C_1", math.Inf(1), 1, true, 2.000, 5e-4, ashrae},
	} {
		got, coefficient, _ := NewSphere(c.bi).Term(c.n)
		if c.c {
			got = coefficient
		}
		if !(math.Abs(got-c.want) <= c.tolerance) {
			t.Errorf("%s at Bi %v = %.8g, want %v within %v (%s)", c.what, c.bi, got, c.want, c.tolerance, c.source)
		}
	}
}
