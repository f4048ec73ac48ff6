package wall

import (
	"math"

	"example.com/coolward/internal/eigen"
)

// A skin is the body behind one face as if there were no other one. With ψ = (r/rf)^{m/2} T and the distance d from
// the face, conduction in it is ∂ψ/∂Fo = ψ” + c ψ, −ψ'(0) = (what comes in) + curvature·ψ. In a plate and a sphere c is
// 0 and the answers are those of the semi-infinite body (H. S. Carslaw and J. C. Jaeger, Conduction of Heat in
// Solids, 2nd ed., chapters II and XIII, from memory). In a cylinder c = 1/(4r²); it is taken at the face and to first
// order, ψ = S + c (Fo S − ∫ S dFo), which leaves out about (√Fo/rf)³/4.
type skin struct {
	h         float64
	curvature float64 // m/(2 rf), below 0 at an inner face
	radius    float64 // rf
	power     float64 // m/2
	c         float64
	inward    float64 // +1 if r grows with d
}

// skins returns those of the inner and the outer face.
func (m *Modes) skins() (inner, outer skin) {
	b := &m.Body
	power := float64(b.Dimension) / 2
	inner = skin{h: m.Ha, curvature: -b.curve(b.Ra), radius: b.Ra, power: power, inward: 1}
	outer = skin{h: m.Hb, curvature: b.curve(b.Rb), radius: b.Rb, power: power, inward: -1}
	if b.Dimension == 1 {
		inner.c, outer.c = 1/(4*b.Ra*b.Ra), 1/(4*b.Rb*b.Rb)
	}
	return inner, outer
}

// factor returns (rf/r)^{m/2}.
func (s *skin) factor(d float64) float64 {
	if s.power == 0 {
		return 1
	}
	ratio := s.radius / (s.radius + s.inward*d)
	if s.power == 1 {
		return ratio
	}
	return math.Sqrt(ratio)
}

// unheard is d/(2√Fo) from which erfc is below 1e-18.
const unheard = 6.3

// plain returns S: the answer ψ to surroundings that have risen by 1, or to a flux of 1 that enters if H is 0.
func (s *skin) plain(d, fo float64) float64 {
	switch {
	case fo <= 0 || d > 2*unheard*math.Sqrt(fo):
		return 0
	case math.IsInf(s.h, 1):
		return math.Erfc(d / (2 * math.Sqrt(fo)))
	case s.h == 0:
		return eigen.FaceResponse(d, -s.curvature, fo)
	}
	return s.h * eigen.FaceResponse(d, s.h-s.curvature, fo)
}

// integral returns ∫ S dFo by quadrature, with Fo x² for time, over which S is smooth, from where it is not 0.
func (s *skin) integral(d, fo float64) float64 {
	from := d / (2 * unheard * math.Sqrt(fo))
	if !(from < 1) {
		return 0
	}
	total := 0.0
	lo := from
	for _, share := range [...]float64{0.15, 0.45, 1} {
		hi := from + share*(1-from)
		for i, g := range gauss.x {
			x := lo + (hi-lo)*g
			total += (hi - lo) * gauss.weight[i] * x * s.plain(d, fo*x*x)
		}
		lo = hi
	}
	return 2 * fo * total
}

// step returns the answer in T.
func (s *skin) step(d, fo float64) float64 {
	psi := s.plain(d, fo)
	if psi == 0 {
		return 0
	}
	if s.c != 0 {
		psi += s.c * (fo*psi - s.integral(d, fo))
	}
	return s.factor(d) * psi
}

// ramp returns ∫ step dFo. What c adds is below what it leaves out of the step.
func (s *skin) ramp(d, fo float64) float64 {
	if fo <= 0 {
		return 0
	}
	psi := s.integral(d, fo)
	if psi == 0 {
		return 0
	}
	return s.factor(d) * psi
}

// plainFlux returns H (1 − S) at the face, what leaves it there if the surroundings are 1 below the start.
func (s *skin) plainFlux(fo float64) float64 {
	switch {
	case fo <= 0:
		return s.h
	case math.IsInf(s.h, 1):
		return 1/math.Sqrt(math.Pi*fo) - s.curvature
	}
	h := s.h - s.curvature
	if beta := h * math.Sqrt(fo); beta > 0.5 {
		return s.h * ((s.h*eigen.HalfSurface(beta) - s.curvature) / h)
	}
	return s.h * (1 - s.h*eigen.FaceResponse(0, h, fo))
}

// flux returns what leaves the face if the surroundings are 1 below the start.
func (s *skin) flux(fo float64) float64 {
	flux := s.plainFlux(fo)
	if s.c != 0 {
		flux += s.c * (fo*flux - eigen.FaceLoss(s.h, s.curvature, fo))
	}
	return flux
}

// loss returns ∫ flux dFo.
func (s *skin) loss(fo float64) float64 {
	if s.h == 0 {
		return 0
	}
	loss := eigen.FaceLoss(s.h, s.curvature, fo)
	if s.c != 0 {
		total := 0.0
		for i, x := range gauss.x {
			tau := fo * x * x
			total += gauss.weight[i] * x * (2*tau - fo) * s.plainFlux(tau)
		}
		loss += s.c * 2 * fo * total
	}
	return loss
}

// lossIntegral returns ∫ loss dFo.
func (s *skin) lossIntegral(fo float64) float64 {
	total := 0.0
	for i, x := range gauss.x {
		total += gauss.weight[i] * x * s.loss(fo*x*x)
	}
	return 2 * fo * total
}

// missing bounds what the skin of a cylinder leaves out of an answer of 1.
func (s *skin) missing(fo float64) float64 {
	if s.c == 0 {
		return 0
	}
	x := math.Sqrt(fo) / s.radius
	return 0.3 * x * x * x
}
