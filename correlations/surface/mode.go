package surface

import (
	"math"

	"example.com/coolward/correlations"
)

// A mode holds the parts of h from forced and from natural convection, before they are blended.
type mode struct {
	conductance     float64 // k / L at the film temperature, W/(m² K)
	forced, natural side
}

// A side is one of the two parts. Several correlations may add to it with weights that add up to 1.
type side struct {
	h           float64 // Σ weight (Nu − 2) k / L, W/(m² K)
	conductance float64 // Σ weight k / L, W/(m² K)
	scatter     float64 // Σ weight scatter
}

// side returns the part that a correlation of that regime adds to.
func (m *mode) side(regime correlations.Regime) *side {
	if regime == correlations.Forced {
		return &m.forced
	}
	return &m.natural
}

// add adds what a correlation gives beyond conduction.
func (m *mode) add(regime correlations.Regime, weight, excess, conductance, scatter float64) {
	part := m.side(regime)
	part.h += weight * excess * conductance
	part.conductance += weight * conductance
	part.scatter += weight * scatter
}

// A balance is h with its shares.
type balance struct {
	h, nu, scatter              float64
	conduction, forced, natural float64 // shares of h
}

// blend joins the parts. Their Nusselt numbers may be on conductivities at different temperatures:
// they are blended on that of the film, and the conduction limit takes the conductivities by the
// shares, so that each correlation comes out as published where the other part vanishes.
func (m *mode) blend() (balance, error) {
	mix, err := correlations.Mix(
		correlations.Result{Nu: 2 + m.forced.h/m.conductance, Scatter: m.forced.scatter},
		correlations.Result{Nu: 2 + m.natural.h/m.conductance, Scatter: m.natural.scatter})
	if err != nil {
		return balance{}, err
	}
	conductance := mix.Forced*m.forced.conductance + mix.Natural*m.conductance
	moved := (mix.Nu - 2) * m.conductance
	h := moved + 2*conductance
	return balance{
		h:          h,
		nu:         h / conductance,
		scatter:    mix.Scatter,
		conduction: 2 * conductance / h,
		forced:     mix.Forced * moved / h,
		natural:    mix.Natural * moved / h,
	}, nil
}

// regime names the parts that h would change by a notable fraction without.
func (m *mode) regime(h float64) correlations.Regime {
	alike := func(rest float64) bool { return math.Abs(h-rest) < negligible*h }
	switch {
	case alike(2 * m.conductance):
		return correlations.Conduction
	case alike(m.natural.h + 2*m.conductance):
		return correlations.Natural
	case alike(m.forced.h + 2*m.forced.conductance):
		return correlations.Forced
	}
	return correlations.Mixed
}
