package correlations_test

import (
	"math"
	"testing"

	"gonum.org/v1/gonum/integrate/quad"

	"example.com/coolward/correlations"
)

// The mean coefficient of a surface is the mean of the local ones: with x the share of the length, Re ∝ x and
// Ra ∝ x³, Nu mean = ∫ Nu local dx/x. With x = from + (1 - from) s³ the integrand has no singularity.
func TestLocalIntegratesToMean(t *testing.T) {
	mean := func(from float64, local func(x float64) float64) float64 {
		return quad.Fixed(func(s float64) float64 {
			x := from + (1-from)*s*s*s
			return local(x) / x * (1 - from) * 3 * s * s
		}, 0, 1, 300, quad.Legendre{}, 0)
	}
	along := func(c correlations.Correlation, g groups) func(x float64) float64 {
		return func(x float64) float64 {
			g := g
			g.Re, g.Ra = g.Re*x, g.Ra*x*x*x
			return nu(t, c, g)
		}
	}
	for _, tt := range []struct {
		local, mean correlations.Correlation
		g           groups
	}{
		{correlations.PlateLaminarLocal(), correlations.PlateLaminar(), groups{Re: 4e5, Pr: 0.7}},
		{correlations.ChurchillOzoePlateLocal(), correlations.ChurchillOzoePlate(), groups{Re: 4e5, Pr: 0.05}},
		{correlations.PlateTurbulentLocal(), correlations.PlateTurbulent(), groups{Re: 1e7, Pr: 7}},
		{correlations.LeFevrePlateLocal(), correlations.LeFevrePlate(), groups{Ra: 1e8, Pr: 0.7}},
		{correlations.PlateLiquidMetalLocal(), correlations.PlateLiquidMetal(), groups{Re: 1e5, Pr: 0.01}},
	} {
		want := nu(t, tt.mean, tt.g)
		if got := mean(0, along(tt.local, tt.g)); math.Abs(got/want-1) > 1e-6 {
			t.Errorf("%s: mean %v, integrated %v", tt.mean.Name(), want, got)
		}
	}

	// Laminar up to the transition, turbulent from there. The turbulent mean, 0.037, is 0.0296/0.8.
	for _, g := range []groups{{Re: 1e6, Pr: 0.7, TransitionRe: 5e5}, {Re: 2e7, Pr: 7, TransitionRe: 3e5}} {
		at := g.TransitionRe / g.Re
		laminar := groups{Re: g.TransitionRe, Pr: g.Pr}
		got := mean(0, along(correlations.PlateLaminarLocal(), laminar)) + mean(at, along(correlations.PlateTurbulentLocal(), g))
		if want := nu(t, correlations.PlateMixed(), g); math.Abs(got/want-1) > 1e-6 {
			t.Errorf("plate at %+v: mean %v, integrated %v", g, want, got)
		}
	}

	// Heated from a share on: the mean is over the heated part. Near the start Nu goes with the distance from it
	// to the power of -1/3 (laminar) or -1/9 (turbulent).
	for _, tt := range []struct {
		local, mean correlations.Correlation
		g           groups
		tolerance   float64
	}{
		{correlations.UnheatedPlateLaminarLocal(), correlations.UnheatedPlateLaminar(), groups{Re: 4e5, Pr: 0.7, UnheatedStart: 0.3}, 1e-6},
		{correlations.UnheatedPlateLaminarLocal(), correlations.UnheatedPlateLaminar(), groups{Re: 4e5, Pr: 0.7}, 1e-6},
		{correlations.UnheatedPlateTurbulentLocal(), correlations.UnheatedPlateTurbulent(), groups{Re: 1e7, Pr: 0.7, UnheatedStart: 0.3}, 1e-6},
		{correlations.UnheatedPlateTurbulentLocal(), correlations.UnheatedPlateTurbulent(), groups{Re: 1e7, Pr: 0.7, UnheatedStart: 0.9}, 1e-6},
	} {
		xi := tt.g.UnheatedStart
		got := mean(xi, func(x float64) float64 {
			g := tt.g
			g.Re, g.UnheatedStart = g.Re*x, xi/x
			return nu(t, tt.local, g)
		}) / (1 - xi)
		if want := nu(t, tt.mean, tt.g); math.Abs(got/want-1) > tt.tolerance {
			t.Errorf("%s from %g: mean %v, integrated %v", tt.mean.Name(), xi, want, got)
		}
	}

	// A disk: Re ∝ r², the mean over the area is ∫ h 2 r dr.
	g := groups{Re: 2e6, Pr: 0.7, TransitionRe: 2.4e5}
	at := math.Sqrt(g.TransitionRe / g.Re)
	h := func(c correlations.Correlation) func(r float64) float64 {
		return func(r float64) float64 { return 2 * nu(t, c, groups{Re: g.Re * r * r, Pr: g.Pr}) }
	}
	got := quad.Fixed(h(correlations.RotatingDisk()), 0, at, 100, quad.Legendre{}, 0) +
		quad.Fixed(h(correlations.RotatingDiskTurbulentLocal()), at, 1, 100, quad.Legendre{}, 0)
	// 0.0195 · 2/2.6 is printed as 0.015.
	if want := nu(t, correlations.RotatingDiskMixed(), g); math.Abs(got/want-1) > 1e-8 {
		t.Errorf("disk: mean %v, integrated %v", want, got)
	}
}
