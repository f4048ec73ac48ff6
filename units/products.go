package units

import "math"

// AreaOf returns a·b, the area of a rectangle.
func AreaOf(a, b Length) Area { return Area{si: a.si * b.si} }

// VolumeOf returns a·l, the volume of a prism of length l on the area a.
func VolumeOf(a Area, l Length) Volume { return Volume{si: a.si * l.si} }

// MassOf returns ρ·V.
func MassOf(rho Density, v Volume) Mass { return Mass{si: rho.si * v.si} }

// HeatCapacityOf returns ρ·c·V, the heat that a body takes up for a rise of one kelvin.
func HeatCapacityOf(rho Density, c SpecificHeat, v Volume) HeatCapacity {
	return HeatCapacity{si: rho.si * c.si * v.si}
}

// VolumetricHeatCapacityOf returns ρ·c.
func VolumetricHeatCapacityOf(rho Density, c SpecificHeat) VolumetricHeatCapacity {
	return VolumetricHeatCapacity{si: rho.si * c.si}
}

// DiffusivityOf returns the thermal diffusivity k/(ρ·c).
func DiffusivityOf(k Conductivity, rho Density, c SpecificHeat) Diffusivity {
	return Diffusivity{si: k.si / (rho.si * c.si)}
}

// KinematicViscosityOf returns µ/ρ.
func KinematicViscosityOf(mu Viscosity, rho Density) Diffusivity {
	return Diffusivity{si: mu.si / rho.si}
}

// EffusivityOf returns √(k·ρ·c).
func EffusivityOf(k Conductivity, rho Density, c SpecificHeat) Effusivity {
	return Effusivity{si: math.Sqrt(k.si * rho.si * c.si)}
}

// FluxOf returns h·ΔT, the heat flux for a coefficient and a difference.
func FluxOf(h HeatTransferCoefficient, d TemperatureDifference) HeatFlux {
	return HeatFlux{si: h.si * d.si}
}

// PowerOf returns q·A, the power that passes an area.
func PowerOf(q HeatFlux, a Area) Power { return Power{si: q.si * a.si} }

// EnergyOf returns P·t.
func EnergyOf(p Power, t Duration) Energy { return Energy{si: p.si * t.si} }

// HeatOf returns C·ΔT, the heat for a change of temperature at constant heat capacity.
func HeatOf(c HeatCapacity, d TemperatureDifference) Energy { return Energy{si: c.si * d.si} }

// ConductanceOf returns h·A.
func ConductanceOf(h HeatTransferCoefficient, a Area) Conductance {
	return Conductance{si: h.si * a.si}
}

// TimeConstantOf returns C/G, the time in which a lumped body loses 63 % of its excess temperature.
func TimeConstantOf(c HeatCapacity, g Conductance) Duration { return Duration{si: c.si / g.si} }

// DistanceOf returns v·t.
func DistanceOf(v Velocity, t Duration) Length { return Length{si: v.si * t.si} }

// ConductionFluxOf returns k·gradient, the heat flux down a temperature gradient (Fourier's law).
func ConductionFluxOf(k Conductivity, gradient TemperatureGradient) HeatFlux {
	return HeatFlux{si: k.si * gradient.si}
}

// GradientOf returns ΔT/L.
func GradientOf(d TemperatureDifference, l Length) TemperatureGradient {
	return TemperatureGradient{si: d.si / l.si}
}

// RateOf returns ΔT/t.
func RateOf(d TemperatureDifference, t Duration) TemperatureRate {
	return TemperatureRate{si: d.si / t.si}
}

// CoefficientOf returns q/ΔT, the heat transfer coefficient of a flux and a difference.
func CoefficientOf(q HeatFlux, d TemperatureDifference) HeatTransferCoefficient {
	return HeatTransferCoefficient{si: q.si / d.si}
}

// InsulanceOf returns L/k, the thermal insulance of a layer.
func InsulanceOf(l Length, k Conductivity) ThermalInsulance {
	return ThermalInsulance{si: l.si / k.si}
}

// ResistanceOf returns R/A, the thermal resistance of an area with insulance R.
func ResistanceOf(r ThermalInsulance, a Area) ThermalResistance {
	return ThermalResistance{si: r.si / a.si}
}

// DrivenPowerOf returns ΔT/R, the power that a difference drives through a resistance.
func DrivenPowerOf(d TemperatureDifference, r ThermalResistance) Power {
	return Power{si: d.si / r.si}
}

// HeatSourceOf returns P/V, the volumetric heat source of a power that is spread over a volume.
func HeatSourceOf(p Power, v Volume) HeatSource { return HeatSource{si: p.si / v.si} }

// LatentHeatOf returns m·L, the heat of a change of phase.
func LatentHeatOf(m Mass, l SpecificEnergy) Energy { return Energy{si: m.si * l.si} }

// MassFlowOf returns ṁ″·A, the mass flow through an area.
func MassFlowOf(flux MassFlux, a Area) MassFlow { return MassFlow{si: flux.si * a.si} }

// EvaporationFluxOf returns ṁ″·L, the heat flux that a mass flux of vapour carries.
func EvaporationFluxOf(flux MassFlux, l SpecificEnergy) HeatFlux {
	return HeatFlux{si: flux.si * l.si}
}
