package series

import (
	"math"
	"math/cmplx"

	"example.com/coolward/internal/eigen"
	"example.com/coolward/units"
	"example.com/coolward/units/shape"
)

// An Oscillation is how a place follows an ambient that oscillates as a sine, once the start is forgotten.
type Oscillation struct {
	Period units.Duration
	Ratio  float64        // amplitude of the place over that of the ambient, 0 to 1
	Lag    units.Duration // by which the place is late
}

// Oscillation returns how a place, or [shape.Mean], follows an ambient, or a prescribed surface temperature,
// that oscillates with the given period. It is exact, and has nothing to do with the start temperature. It
// returns an [*units.ArgumentError] for a place that is not in the body, for a body of several coordinates, and
// for a period that is not above zero or has no Fourier number that a float64 holds.
func (s *Solution) Oscillation(place shape.Place, period units.Duration) (Oscillation, error) {
	if err := s.oneCoordinate(); err != nil {
		return Oscillation{}, err
	}
	if err := units.CheckPositive("period", period); err != nil {
		return Oscillation{}, err
	}
	omega := 2 * math.Pi / s.Fourier(period)
	if !(omega > 1e-290 && omega < 1e290) {
		return Oscillation{}, outOfRange("angular frequency 2π R²/(alpha period)", omega)
	}
	modes := s.factors[0].modes
	var amplitude complex128
	if place.IsMean() {
		amplitude = eigen.TransferOfMean(modes, omega)
	} else {
		p, err := s.position(place)
		if err != nil {
			return Oscillation{}, err
		}
		amplitude = eigen.Transfer(modes, p[0], omega)
	}
	ratio := cmplx.Abs(amplitude)
	if ratio == 0 {
		return Oscillation{Period: period}, nil
	}
	// the phase of a deep place passes −π; it is that of the surface and what the way adds
	phase := cmplx.Phase(amplitude)
	if !place.IsMean() {
		phase -= 2 * math.Pi * math.Round((phase-s.phaseNear(place, omega))/(2*math.Pi))
	}
	return Oscillation{Period: period, Ratio: math.Min(1, ratio), Lag: period.Scale(math.Max(0, -phase/(2*math.Pi)))}, nil
}

// phaseNear returns the phase to within π: that of a wave in a body without end, which is at the surface before.
func (s *Solution) phaseNear(place shape.Place, omega float64) float64 {
	p, err := s.position(place)
	if err != nil {
		return 0
	}
	surface := cmplx.Phase(eigen.Transfer(s.factors[0].modes, 1, omega))
	return surface - (1-p[0])*math.Sqrt(omega/2)
}

// At returns mean + Ratio · amplitude · sin(2π (t − Lag)/Period), the temperature of the place at time t if the
// ambient is mean + amplitude · sin(2π t/Period).
func (o Oscillation) At(mean units.Temperature, amplitude units.TemperatureDifference, t units.Duration) units.Temperature {
	if o.Period.SI() == 0 {
		return mean
	}
	angle := 2 * math.Pi * math.Mod(t.Sub(o.Lag).Ratio(o.Period), 1)
	return mean.Add(amplitude.Scale(o.Ratio * math.Sin(angle)))
}
