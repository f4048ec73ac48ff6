package surface

import (
	"math"

	"example.com/coolward/correlations"
	"example.com/coolward/internal/pow"
)

// A mode holds the parts of h from forced and from natural convection, before they are blended.
type mode struct {
	forced, natural side
	opposed         bool // the stream runs against the buoyant flow
}

// A side is one of the two parts. Several correlations may add to it with weights that add up to 1.
type side struct {
	weight       float64 // Σ weight, 0 if nothing was added
	h            float64 // Σ weight (Nu − Nu at rest) k / L, W/(m² K)
	rest         float64 // Σ weight Nu at rest k / L, W/(m² K)
	conductivity float64 // Σ weight k, W/(m K)
	scatter      float64 // Σ weight scatter
}

// side returns the part that a correlation of that regime adds to.
func (m *mode) side(regime correlations.Regime) *side {
	if regime == correlations.Forced {
		return &m.forced
	}
	return &m.natural
}

// add adds what a correlation gives on a length, beyond rest and at rest.
func (m *mode) add(regime correlations.Regime, weight, excess, rest, conductivity, length, scatter float64) {
	part := m.side(regime)
	part.weight += weight
	part.h += weight * excess * conductivity / length
	part.rest += weight * rest * conductivity / length
	part.conductivity += weight * conductivity
	part.scatter += weight * scatter
}

// A balance is h with its shares.
type balance struct {
	h, scatter                  float64
	conductivity                float64 // by the shares
	alike                       bool    // opposed, and one part beyond rest is 0.5 to 2 times the other
	conduction, forced, natural float64 // shares of h
}

// blend joins the parts, what each gives beyond rest by the power of the mixture. Rest is that of natural convection, so that a
// stream that vanishes leaves it as it is; a stream by whose correlation less would flow than at rest adds nothing. Each
// correlation comes out as published where the other part vanishes.
func (m *mode) blend() (balance, error) {
	natural := m.natural
	if natural.weight == 0 {
		natural.rest, natural.conductivity = m.forced.rest, m.forced.conductivity
	}
	rest := natural.rest
	// The mixture is of Nusselt numbers, and of anything else in their proportion.
	forced := max(0, m.forced.rest-rest+m.forced.h)
	mix, err := correlations.Blend{Exponent: correlations.MixExponent}.Mix(
		correlations.Result{Nu: forced, Scatter: m.forced.scatter},
		correlations.Result{Nu: natural.h, Scatter: natural.scatter})
	if err != nil {
		return balance{}, err
	}
	if m.opposed {
		mix.Nu = against(forced, natural.h)
		// So that the upper end reaches the larger of the two.
		mix.Scatter = min(mix.Scatter+(max(forced, natural.h)-mix.Nu)/(mix.Nu+rest), widest)
	}
	h := mix.Nu + rest
	return balance{
		h:            h,
		conductivity: mix.Forced*m.forced.conductivity + mix.Natural*natural.conductivity,
		scatter:      mix.Scatter,
		alike:        m.opposed && forced > natural.h/2 && forced < 2*natural.h,
		conduction:   rest / h,
		forced:       mix.Forced * mix.Nu / h,
		natural:      mix.Natural * mix.Nu / h,
	}, nil
}

const (
	cancellation = 1.0 / 4 // of the power that is left where a stream and the buoyant flow against it are equal
	widest       = 0.95    // scatter, so that the lower end stays above 0
)

// against returns what a stream and the buoyant flow against it give together: by their cubes,
//
//	h³ = ((hF³ − hN³)² + hF³ hN³/16)^(1/2)
//
// The second term is our own: without it, as published, nothing would be left where both are equal, which no body does; with it 63 % of
// one is. Where one is twice the other or more it adds less than 0.2 %.
func against(forced, natural float64) float64 {
	large := max(forced, natural)
	if large == 0 {
		return 0
	}
	f, n := forced/large, natural/large
	f, n = f*f*f, n*n*n
	return large * pow.Of((f-n)*(f-n)+cancellation*cancellation*f*n, 1.0/6)
}

// regime names the parts that h would change by a notable fraction without.
func (m *mode) regime(h float64) correlations.Regime {
	still := m.natural.rest
	if m.natural.weight == 0 {
		still = m.forced.rest
	}
	alike := func(rest float64) bool { return math.Abs(h-rest) < negligible*h }
	switch {
	case alike(still):
		return correlations.Conduction
	case alike(m.natural.h + m.natural.rest):
		return correlations.Natural
	case alike(m.forced.h + m.forced.rest):
		return correlations.Forced
	}
	return correlations.Mixed
}
