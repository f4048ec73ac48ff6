package property

import (
	"fmt"
	"math"
	"testing"
)

// A table of straight lines, with an exponential viscosity, is its own interpolant.
func TestLiquidOfLines(t *testing.T) {
	ts := []float64{300, 310, 350, 400}
	var rho, c, k, mu []float64
	for _, x := range ts {
		rho = append(rho, 1200-0.5*x)
		c = append(c, 1000+2*x)
		k = append(k, 0.2-1e-4*x)
		mu = append(mu, math.Exp(-x/50))
	}
	l, err := NewLiquid(ts, rho, c, k, mu)
	if err != nil {
		t.Fatal(err)
	}
	for x := 300.0; x <= 400; x += 6.25 {
		gotRho, gotC, gotK, gotMu, beta := l.At(x)
		at := fmt.Sprintf(" at %g K", x)
		near(t, "density"+at, gotRho, 1200-0.5*x, 1e-9)
		near(t, "specific heat"+at, gotC, 1000+2*x, 1e-9)
		near(t, "conductivity"+at, gotK, 0.2-1e-4*x, 1e-13)
		near(t, "viscosity"+at, gotMu, math.Exp(-x/50), 1e-14)
		near(t, "expansion"+at, beta, 0.5/(1200-0.5*x), 1e-13)
	}
}

// A line of Clausius and Clapeyron, ln p linear in 1/T, is its own interpolant.
func TestSaturationLine(t *testing.T) {
	p := func(x float64) float64 { return math.Exp(25 - 3000/x) }
	s, err := NewSaturationLine([]float64{250, 300, 310, 400}, []float64{p(250), p(300), p(310), p(400)})
	if err != nil {
		t.Fatal(err)
	}
	for x := 250.0; x <= 400; x += 12.5 {
		near(t, fmt.Sprintf("pressure at %g K", x), s.At(x), p(x), 1e-11*p(x))
	}
}

// The fit of the Prandtl number that M. Conde (2011) gives beside those of its factors, from memory: ln Pr = A₁ + A₂ x + A₃ q + A₄ x q + A₅ q². It is a fit of its
// own and agrees to 3 % up to x = 0.5, and to 6 % at 0.6, where both end.
func TestGlycolPrandtlFit(t *testing.T) {
	for _, g := range []struct {
		name string
		make func(float64) *Glycol
		a    [5]float64
	}{
		{"ethylene glycol", NewEthyleneGlycol, [5]float64{3.96951, 0.70076, -12.98045, 2.64789, 11.589}},
		{"propylene glycol", NewPropyleneGlycol, [5]float64{6.66139, -6.9944, -18.55114, 12.0464, 14.47735}},
	} {
		for _, x := range []float64{0.2, 0.3, 0.4, 0.5, 0.6} {
			for _, celsius := range []float64{-5, 0, 20, 40, 60} {
				q := zeroCelsius / (celsius + zeroCelsius)
				want := math.Exp(g.a[0] + g.a[1]*x + q*(g.a[2]+g.a[3]*x+g.a[4]*q))
				_, cp, k, mu, _ := g.make(x).At(celsius + zeroCelsius)
				tolerance := 0.03
				if x == 0.6 {
					tolerance = 0.06
				}
				near(t, fmt.Sprintf("Prandtl number of %s, x = %g, at %g °C", g.name, x, celsius), mu*cp/k, want, tolerance*want)
			}
		}
	}
}

// Sodium boils at 1 atm near 1155 K (Fink and Leibowitz, from memory).
func TestSodiumBoils(t *testing.T) {
	near(t, "saturation pressure at 1154.7 K", SodiumSaturation(1154.7), 101325, 1500)
}
