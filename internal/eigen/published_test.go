package eigen

import (
	"math"
	"testing"
)

// The tolerance is half a unit of the last printed digit, or a whole one where the table does not round
// to the nearest. At Bi = 1 the equation of a sphere is cot ζ = 0: ζ_1 = π/2 and C_1 = 4/π, exactly.
func TestPublished(t *testing.T) {
	const (
		cengel          = "Y. A. Çengel, Heat and Mass Transfer, 6th ed., table 4-2"
		essentials      = "Essentials of Applied Mathematics for Scientists and Engineers (2007), appendix A, table A.2 with C = Bi − 1"
		ashrae          = "ASHRAE Handbook, Refrigeration, lag factor j for Bi to infinity (from memory)"
		essentialsPlate = "Essentials of Applied Mathematics for Scientists and Engineers (2007), appendix A, table A.1"
	)
	for _, c := range []struct {
		body      int // its dimension
		what      string
		bi        float64
		n         int
		c         bool // the coefficient rather than the root
		want      float64
		tolerance float64
		source    string
	}{
		{3, "ζ_1", 1, 1, false, math.Pi / 2, 1e-15, "exact"},
		{3, "C_1", 1, 1, true, 4 / math.Pi, 1e-15, "exact"},
		{3, "ζ_3", 1, 3, false, 5 * math.Pi / 2, 1e-14, "exact"},
		{3, "ζ_1", 1, 1, false, 1.5708, 5e-5, cengel},
		{3, "C_1", 1, 1, true, 1.2732, 5e-5, cengel},
		{3, "ζ_1", 0.1, 1, false, 0.5423, 5e-5, cengel},
		{3, "C_1", 0.1, 1, true, 1.0298, 5e-5, cengel},
		{3, "ζ_1", 2, 1, false, 2.0288, 5e-5, essentials},
		{3, "ζ_2", 2, 2, false, 4.9132, 5e-5, essentials},
		{3, "ζ_3", 2, 3, false, 7.9787, 5e-5, essentials},
		// The table rounds these two up: the roots are 11.08554 and 14.20744.
		{3, "ζ_4", 2, 4, false, 11.0856, 1e-4, essentials},
		{3, "ζ_5", 2, 5, false, 14.2075, 1e-4, essentials},
		{3, "ζ_6", 2, 6, false, 17.3364, 5e-5, essentials},
		{3, "C_1", math.Inf(1), 1, true, 2.000, 5e-4, ashrae},
		{1, "ζ_1", 0.01, 1, false, 0.0998, 5e-5, cengel},
		{1, "C_1", 0.01, 1, true, 1.0017, 5e-5, cengel},
		{1, "ζ_1", 10, 1, false, 1.4289, 5e-5, cengel},
		{1, "C_1", 10, 1, true, 1.2620, 5e-5, cengel},
		{1, "ζ_1", math.Inf(1), 1, false, math.Pi / 2, 1e-15, "exact"},
		{1, "C_1", math.Inf(1), 1, true, 4 / math.Pi, 1e-15, "exact"},
		{1, "C_1", math.Inf(1), 1, true, 1.273, 5e-4, ashrae},
		// The page heads the table α tan α + C = 0; its numbers belong to α tan α = C.
		{1, "ζ_1", 0.1, 1, false, 0.3111, 5e-5, essentialsPlate},
		{1, "ζ_2", 0.1, 2, false, 3.1731, 5e-5, essentialsPlate},
		{1, "ζ_3", 0.1, 3, false, 6.2991, 5e-5, essentialsPlate},
		{1, "ζ_4", 0.1, 4, false, 9.4354, 5e-5, essentialsPlate},
		{1, "ζ_5", 0.1, 5, false, 12.5743, 5e-5, essentialsPlate},
		{1, "ζ_6", 0.1, 6, false, 15.7143, 5e-5, essentialsPlate},
		{2, "ζ_1", 0.01, 1, false, 0.1412, 5e-5, cengel},
		{2, "C_1", 0.01, 1, true, 1.0025, 5e-5, cengel},
	} {
		got, coefficient, _ := bodies[c.body-1].new(c.bi).Term(c.n)
		if c.c {
			got = coefficient
		}
		if !(math.Abs(got-c.want) <= c.tolerance) {
			t.Errorf("%s, %s at Bi %v = %.8g, want %v within %v (%s)", bodies[c.body-1].name, c.what, c.bi, got, c.want, c.tolerance, c.source)
		}
	}
}
