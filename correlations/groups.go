package correlations

import (
	"math"

	"example.com/coolward/units"
)

// Groups are the dimensionless numbers that correlations are functions of. All are at the reference
// temperature and on the characteristic length of the correlation they are given to. A group that a
// correlation does not use may be left 0. For the transfer of mass, Pr is the Schmidt number and the
// result of the same formula is the Sherwood number.
type Groups struct {
	Re float64 // Reynolds number, speed × length / kinematic viscosity; 0 or above
	Pr float64 // Prandtl number, kinematic viscosity / thermal diffusivity; 0 or above
	Ra float64 // Rayleigh number, g β |ΔT| length³ / (kinematic viscosity × thermal diffusivity); 0 or above

	// FluxRa is the Rayleigh number on a heat flux q instead of a difference of temperatures,
	// g β q length⁴ / (conductivity × kinematic viscosity × thermal diffusivity).
	FluxRa float64
	// FilmRa is the number of a film that condenses or boils off,
	// g ρ (ρ liquid − ρ vapour) h length³ / (μ k ΔT), with ρ, μ and k of the film and with h the heat of
	// vaporisation, corrected as the correlation says.
	FilmRa float64

	// ViscosityRatio is the viscosity of the free stream over that at the wall, above 1 in a liquid
	// that is heated. In a gas it is 1 by convention.
	ViscosityRatio float64
	// PrandtlRatio is the Prandtl number of the free stream over that at the wall. In a gas it is 1.
	PrandtlRatio float64
	// TemperatureRatio is the film temperature over that of the free stream, both absolute.
	TemperatureRatio float64

	// TransitionRe and TransitionRa are where the boundary layer turns turbulent: 5e5 is usual for a
	// plate in a calm stream.
	TransitionRe, TransitionRa float64

	// Inclination is the angle of a plate from the vertical, or of a layer from the horizontal.
	Inclination units.Angle

	// Slenderness is the length of a cylinder or tube over its diameter, or the height of an
	// enclosure or channel over its gap.
	Slenderness float64
	// UnheatedStart is the unheated length at the leading edge over the distance from that edge.
	UnheatedStart float64

	Standoff float64 // distance of a nozzle from the surface over the nozzle's diameter or width
	Reach    float64 // distance from the stagnation point to the edge over the nozzle's diameter or width
	JetArea  float64 // exit area of a nozzle over the surface that it serves

	VoidFraction float64 // share of a bed that is fluid, from 0 to 1
	PitchRatio   float64 // transverse over longitudinal pitch of a tube bank
	Rows         float64 // rows of a tube bank in the direction of the flow

	// BodyNu is the Nusselt number of a body in a fluid at rest, on the square root of its surface.
	BodyNu float64
	// Gravity is the body gravity function, which says how the surface lies to the vertical.
	Gravity float64
	// Perimeter is the largest perimeter normal to the stream over the square root of the surface.
	Perimeter float64
}

// A Group names one of the [Groups], or a product of them that a source states its range in.
type Group uint8

// The groups.
const (
	Reynolds Group = iota
	Prandtl
	Rayleigh
	ViscosityRatio
	FluxRayleigh
	FilmRayleigh
	PrandtlRatio
	TemperatureRatio
	TransitionReynolds
	TransitionRayleigh
	Inclination // in degrees
	Slenderness
	UnheatedStart
	Standoff
	Reach
	JetArea
	VoidFraction
	PitchRatio
	Rows
	BodyNusselt
	Gravity
	Perimeter
	Grashof             // Ra / Pr
	Peclet              // Re Pr
	ChannelRayleigh     // Ra / slenderness
	ChannelFluxRayleigh // FluxRa / slenderness
	InclinedRayleigh    // Ra cos(inclination)
	ScaledRayleigh      // Ra Pr / (0.2 + Pr)
	Richardson          // Ra / (Pr Re²)
	SlotArea            // jet area over that of the best array of slots, (60 + 4 (standoff/2 - 2)²)^(-1/2)
	Curvature           // 32^(1/2) Gr^(-1/4) slenderness, how much thicker than a vertical cylinder its boundary layer is
	Roughness           // height of the roughness of a tube over its diameter, of the friction factors alone
	groupCount
	fieldCount = Grashof // the groups before it are fields, the rest products of them
)

var groupNames = [groupCount]string{
	"Reynolds number",
	"Prandtl number",
	"Rayleigh number",
	"viscosity ratio",
	"Rayleigh number on the heat flux",
	"film number",
	"Prandtl ratio",
	"temperature ratio",
	"Reynolds number of transition",
	"Rayleigh number of transition",
	"inclination",
	"slenderness",
	"unheated start",
	"standoff",
	"reach",
	"jet area",
	"void fraction",
	"pitch ratio",
	"rows",
	"Nusselt number of the body at rest",
	"body gravity function",
	"perimeter",
	"Grashof number",
	"Péclet number",
	"Rayleigh number over slenderness",
	"Rayleigh number on the heat flux over slenderness",
	"Rayleigh number × cos(inclination)",
	"Rayleigh number × Pr / (0.2 + Pr)",
	"Richardson number",
	"jet area over that of the best array",
	"curvature",
	"relative roughness",
}

// String returns the name, such as "Reynolds number".
func (g Group) String() string {
	if g < groupCount {
		return groupNames[g]
	}
	return "unknown group"
}

// of returns the number of that group, an inclination in degrees. It is NaN for a group that does not
// exist, and for a product that has no value.
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
	case FluxRayleigh:
		return groups.FluxRa
	case FilmRayleigh:
		return groups.FilmRa
	case PrandtlRatio:
		return groups.PrandtlRatio
	case TemperatureRatio:
		return groups.TemperatureRatio
	case TransitionReynolds:
		return groups.TransitionRe
	case TransitionRayleigh:
		return groups.TransitionRa
	case Inclination:
		return groups.Inclination.In(units.Degree)
	case Slenderness:
		return groups.Slenderness
	case UnheatedStart:
		return groups.UnheatedStart
	case Standoff:
		return groups.Standoff
	case Reach:
		return groups.Reach
	case JetArea:
		return groups.JetArea
	case VoidFraction:
		return groups.VoidFraction
	case PitchRatio:
		return groups.PitchRatio
	case Rows:
		return groups.Rows
	case BodyNusselt:
		return groups.BodyNu
	case Gravity:
		return groups.Gravity
	case Perimeter:
		return groups.Perimeter
	case Grashof:
		return groups.Ra / groups.Pr
	case Peclet:
		return groups.Re * groups.Pr
	case ChannelRayleigh:
		return over(groups.Ra, groups.Slenderness)
	case ChannelFluxRayleigh:
		return over(groups.FluxRa, groups.Slenderness)
	case InclinedRayleigh:
		return groups.inclined()
	case ScaledRayleigh:
		return groups.Ra * groups.Pr / (0.2 + groups.Pr)
	case Richardson:
		return groups.Ra / (groups.Pr * groups.Re * groups.Re)
	case Curvature:
		return math.Sqrt(32) * groups.Slenderness / quarter(groups.Ra/groups.Pr)
	case SlotArea:
		return groups.JetArea / groups.bestSlots()
	}
	return math.NaN()
}

// graetz returns the Graetz number, 0 at rest.
func (g *Groups) graetz() float64 { return over(g.Re*g.Pr, g.Slenderness) }

// inclined returns the Rayleigh number with the part of gravity along a plate.
func (g *Groups) inclined() float64 { return g.Ra * math.Cos(g.Inclination.SI()) }

// bestSlots returns the jet area of Martin's best array of slot nozzles at a standoff over the width.
func (g *Groups) bestSlots() float64 {
	x := g.Standoff/2 - 2
	return 1 / math.Sqrt(60+4*x*x)
}

// over returns a/b, and 0 for 0/0: what does not move does not move in any geometry.
func over(a, b float64) float64 {
	if a == 0 {
		return 0
	}
	return a / b
}

// check returns an [*units.ArgumentError] for a group that is negative, infinite or no number.
func (g *Groups) check() error {
	// The bits of a number that is finite and not below 0 are below those of infinity, so that one
	// maximum answers for several. A negative 0 is looked at below.
	const infinity = 0x7FF << 52
	if max(math.Float64bits(g.Re), math.Float64bits(g.Pr), math.Float64bits(g.Ra), math.Float64bits(g.FluxRa),
		math.Float64bits(g.FilmRa), math.Float64bits(g.ViscosityRatio), math.Float64bits(g.PrandtlRatio),
		math.Float64bits(g.TemperatureRatio)) < infinity &&
		max(math.Float64bits(g.TransitionRe), math.Float64bits(g.TransitionRa), math.Float64bits(g.Inclination.SI()),
			math.Float64bits(g.Slenderness), math.Float64bits(g.UnheatedStart), math.Float64bits(g.Standoff),
			math.Float64bits(g.Reach)) < infinity &&
		max(math.Float64bits(g.JetArea), math.Float64bits(g.VoidFraction), math.Float64bits(g.PitchRatio),
			math.Float64bits(g.Rows), math.Float64bits(g.BodyNu), math.Float64bits(g.Gravity),
			math.Float64bits(g.Perimeter)) < infinity {
		return nil
	}
	for group := range fieldCount {
		if group == Inclination {
			if !usable(g.Inclination.SI()) {
				return &units.ArgumentError{Field: group.String(), Value: g.Inclination, Accepted: "finite and not below 0"}
			}
			continue
		}
		if x := group.of(g); !usable(x) {
			return &units.ArgumentError{Field: group.String(), Value: x, Accepted: "finite and not below 0"}
		}
	}
	return nil
}

func usable(x float64) bool { return x >= 0 && x <= math.MaxFloat64 }
