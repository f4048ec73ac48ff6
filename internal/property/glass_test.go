package property

import (
	"fmt"
	"testing"
)

// Fused silica, F. P. Incropera et al., Fundamentals of Heat and Mass Transfer, 6th ed., table A.2, from memory: a witness
// for the coefficients of SiO2, which is 72 % of a window. The equation is good to some per cent (4 % taken here).
func TestGlassAgainstFusedSilica(t *testing.T) {
	silica := NewGlass(1.4, Oxides{SiO2: 1})
	for _, r := range []struct{ temp, c float64 }{{300, 745}, {400, 905}, {600, 1040}, {800, 1105}, {1000, 1155}} {
		near(t, fmt.Sprintf("specific heat of fused silica at %g K", r.temp), silica.SpecificHeat(r.temp), r.c, 0.04*r.c)
	}
}
