package correlations

import (
	"math"

	"example.com/coolward/units"
)

// Groups are the dimensionless numbers that correlations are functions of. All are at the reference
// temperature and on the characteristic length of the correlation they are given to. A group that a
// correlation does not use may be left 0.
type Groups struct {
	Re float64 // Reynolds number, speed × length / kinematic viscosity; 0 or above
	Pr float64 // Prandtl number, kinematic viscosity / thermal diffusivity; 0 or above
	Ra float64 // Rayleigh number, g β |ΔT| length³ / (kinematic viscosity × thermal diffusivity); 0 or above

	// ViscosityRatio is the viscosity of the free stream over that at the wall, above 1 in a liquid
	// that is heated. In a gas it is 1 by convention.
	ViscosityRatio float64
}

// A Group names one of the [Groups].
type Group uint8

// The groups.
const (
	Reynolds Group = iota
	Prandtl
	Rayleigh
	ViscosityRatio
	groupCount
)

var groupNames = [groupCount]string{"Reynolds number", "Prandtl number", "Rayleigh number", "viscosity ratio"}

// String returns the name, such as "Reynolds number".
func (g Group) String() string {
	if g < groupCount {
		return groupNames[g]
	}
	return "unknown group"
}

// of returns the number of that group. It is NaN for a group that does not exist.
func (g Group) of(groups *Groups) float64 {
	switch g {
	case Reynolds:
		return groups.Re
	case Prandtl:
		return groups.Pr
	case Rayleigh:
		return groups.Ra
	case ViscosityRatio:
		return groups.ViscosityRatio
	}
	return math.NaN()
}

// check returns an [*units.ArgumentError] for a group that is negative, infinite or no number.
func (g *Groups) check() error {
	if usable(g.Re) && usable(g.Pr) && usable(g.Ra) && usable(g.ViscosityRatio) {
		return nil
	}
	for group := range groupCount {
		if x := group.of(g); !usable(x) {
			return &units.ArgumentError{Field: group.String(), Value: x, Accepted: "finite and not below 0"}
		}
	}
	return nil
}

func usable(x float64) bool { return x >= 0 && x <= math.MaxFloat64 }
