package correlations

import (
	"math"

	"example.com/coolward/units"
)

// RaithbyHollandsAnnulus returns the correlation of Raithby and Hollands for the effective
// conductivity between two concentric horizontal cylinders,
//
//	Nu = max(1, 0.386 (Pr/(0.861 + Pr))^(1/4) Ra^(1/4))
//
// for Ra up to 1e7 and Pr 0.7 to 6000, with the properties at the mean of the walls.
func RaithbyHollandsAnnulus() Correlation { return Correlation{&raithbyHollandsAnnulus} }

// RaithbyHollandsShell returns the correlation of Raithby and Hollands for the effective
// conductivity between two concentric spheres,
//
//	Nu = max(1, 0.74 (Pr/(0.861 + Pr))^(1/4) Ra^(1/4))
//
// for Ra up to 1e4 and Pr 0.7 to 4000, with the properties at the mean of the walls.
func RaithbyHollandsShell() Correlation { return Correlation{&raithbyHollandsShell} }

var raithbyHollandsAnnulus = record{
	name:      "Raithby and Hollands annulus, natural",
	body:      "horizontal annulus",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = max(1, 0.386 (Pr/(0.861 + Pr))^(1/4) Ra^(1/4))",
	length:    "that of AnnulusLength",
	reference: WallMean,
	ranges:    []Range{within(Rayleigh, "0", "1e7"), within(Prandtl, "0.7", "6000")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "G. D. Raithby and K. G. T. Hollands, A general method of obtaining approximate solutions to laminar and turbulent free convection problems, Adv. Heat Transfer 11 (1975) 265-315",
	status:    FromMemory,
	evidence:  recalled,
	note:      "Nu is effective over true conductivity, to be used in the formula of conduction between cylinders",
	nu:        func(g Groups) float64 { return max(1, 0.386*quarter(g.Ra*g.Pr/(0.861+g.Pr))) },
}

var raithbyHollandsShell = record{
	name:      "Raithby and Hollands spherical shell, natural",
	body:      "spherical shell",
	regime:    Natural,
	driver:    byRayleigh,
	formula:   "Nu = max(1, 0.74 (Pr/(0.861 + Pr))^(1/4) Ra^(1/4))",
	length:    "that of ShellLength",
	reference: WallMean,
	ranges:    []Range{within(Rayleigh, "0", "1e4"), within(Prandtl, "0.7", "4000")},
	scatter:   Scatter{0.15, usualNatural},
	citation:  "G. D. Raithby and K. G. T. Hollands, A general method of obtaining approximate solutions to laminar and turbulent free convection problems, Adv. Heat Transfer 11 (1975) 265-315",
	status:    FromMemory,
	evidence:  recalled,
	note:      "Nu is effective over true conductivity, to be used in the formula of conduction between spheres",
	nu:        func(g Groups) float64 { return max(1, 0.74*quarter(g.Ra*g.Pr/(0.861+g.Pr))) },
}

// AnnulusLength returns the length that the Rayleigh number of [RaithbyHollandsAnnulus] is on, for the radii
// of the two cylinders,
//
//	2 (ln(ro/ri))^(4/3) / (ri^(-3/5) + ro^(-3/5))^(5/3)
//
// It returns an [*units.ArgumentError] unless 0 < inner < outer, both finite.
func AnnulusLength(inner, outer units.Length) (units.Length, error) {
	ri, ro, err := radii(inner, outer)
	if err != nil {
		return units.Length{}, err
	}
	x := ri / ro
	ln := -math.Log(x)
	// With ri taken out: ri^(-3/5) (1 + x^(3/5)), to the power of 5/3.
	return units.Metre.Of(2 * ri * ln * math.Cbrt(ln) / math.Pow(1+power(x, 0.6), 5.0/3)), nil
}

// ShellLength returns the length that the Rayleigh number of [RaithbyHollandsShell] is on, for the radii
// of the two spheres,
//
//	(1/ri - 1/ro)^(4/3) / (2^(1/3) (ri^(-7/5) + ro^(-7/5))^(5/3))
//
// It returns an [*units.ArgumentError] unless 0 < inner < outer, both finite.
func ShellLength(inner, outer units.Length) (units.Length, error) {
	ri, ro, err := radii(inner, outer)
	if err != nil {
		return units.Length{}, err
	}
	x := ri / ro
	gap := 1 - x
	return units.Metre.Of(ri * gap * math.Cbrt(gap/2) / math.Pow(1+power(x, 1.4), 5.0/3)), nil
}

func radii(inner, outer units.Length) (ri, ro float64, err error) {
	ri, ro = inner.SI(), outer.SI()
	if !(ri > 0 && ri <= math.MaxFloat64) {
		return 0, 0, &units.ArgumentError{Field: "inner radius", Value: inner, Accepted: "finite and above 0"}
	}
	if !(ro > ri && ro <= math.MaxFloat64) {
		return 0, 0, &units.ArgumentError{Field: "outer radius", Value: outer, Accepted: "finite and above the inner one"}
	}
	if ri/ro == 0 {
		return 0, 0, &units.ArgumentError{Field: "inner radius", Value: inner, Accepted: "not vanishingly small against the outer one"}
	}
	return ri, ro, nil
}
