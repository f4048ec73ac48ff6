// Package physics holds the constants of nature that several packages need.
package physics

// StefanBoltzmann is the Stefan–Boltzmann constant 2π⁵k⁴/(15h³c²) in W/(m² K⁴), exact by the definition of the
// SI but for the digits left out (CODATA 2018).
const StefanBoltzmann = 5.670374419e-8
