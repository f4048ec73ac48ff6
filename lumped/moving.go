package lumped

import (
	"math"
	"sort"

	"example.com/coolward/internal/root"
	"example.com/coolward/units"
)

// A moving law is the state over time where the exchange is a straight line over the temperature and the ambients
// go with time: dT/dt = −(T − T∞(t))/τ, T∞ the mean of the ambients by their conductance. Between two bends of
// the ambients it is a sum of a straight line, an exponential and sines.
type moving struct {
	start  float64
	tau    float64 // s
	pieces []piece // at least one
	end    float64
}

// A piece is the law from a time on. With s = t − from and E = 1 − exp(−s/τ) it is
//
//	T = first + (ambient − first) E + slope (s − τ E) + Σ size [sin(ω s + φ − δ) − sin(φ − δ) (1 − E)],  tan δ = ω τ,
//
// the answer to the ambient ambient + slope s + Σ size √(1 + (ωτ)²) sin(ω s + φ).
type piece struct {
	from, first, ambient, slope float64
	waves                       []wave
}

// A wave is the answer to an oscillation: size sin(omega s + phase).
type wave struct{ size, omega, phase float64 }

// newMoving returns the law up to end for heat capacity c in J/K.
func newMoving(e *exchange, c, start, end float64) (*moving, error) {
	g, rest := 0.0, e.source-e.damping()*e.given
	weight := e.damping() * e.factor
	for i := range e.ambients {
		g += weight * e.ambients[i].conductance
	}
	m := &moving{start: start, tau: c / g, end: end}
	from := append([]float64{0}, e.breaks()...)
	first := start
	for i, at := range from {
		if at >= end {
			break
		}
		p := piece{from: at, first: first, ambient: rest / g}
		for j := range e.ambients {
			a := &e.ambients[j]
			if err := p.follow(a, weight*a.conductance/g, at+e.shift, m.tau); err != nil {
				return nil, err
			}
		}
		m.pieces = append(m.pieces, p)
		if i+1 < len(from) {
			first = p.first + p.rise(from[i+1]-at, m.tau)
		}
	}
	return m, nil
}

// follow adds an ambient of the given share of the conductance, from the time t of its course on.
func (p *piece) follow(a *ambient, share, t, tau float64) error {
	if a.steady {
		p.ambient += share * a.at
		return nil
	}
	if mean, amplitude, period, lag, ok := a.course.Oscillation(); ok {
		p.ambient += share * mean.SI()
		omega := 2 * math.Pi / period.SI()
		size := share * amplitude.SI() / math.Hypot(1, omega*tau)
		p.waves = append(p.waves, wave{size, omega, math.Mod(omega*(t-lag.SI()), 2*math.Pi) - math.Atan(omega*tau)})
		return nil
	}
	at, err := a.course.At(units.Second.Of(t))
	if err != nil {
		return err
	}
	slope, err := a.course.Rate(units.Second.Of(t))
	if err != nil {
		return err
	}
	p.ambient += share * at.SI()
	p.slope += share * slope.SI()
	return nil
}

// rise returns T − first at s after the start of the piece.
func (p *piece) rise(s, tau float64) float64 {
	gone := -math.Expm1(-s / tau)
	rise := (p.ambient-p.first)*gone + p.slope*(s-tau*gone)
	for _, w := range p.waves {
		sin := math.Sin(w.phase)
		rise += w.size * (math.Sin(w.omega*s+w.phase) - sin*(1-gone))
	}
	return rise
}

// slopeAt returns dT/dt at s after the start of the piece.
func (p *piece) slopeAt(s, tau float64) float64 {
	left := math.Exp(-s / tau)
	slope := (p.ambient-p.first)/tau*left - p.slope*math.Expm1(-s/tau)
	for _, w := range p.waves {
		slope += w.size * (w.omega*math.Cos(w.omega*s+w.phase) + math.Sin(w.phase)/tau*left)
	}
	return slope
}

// bound returns a bound on |T − first − middle − p.slope s| and on the size of the second derivative from s
// on, middle being what the piece tends to.
func (p *piece) bound(s, tau float64) (away, bend, middle float64) {
	middle = p.ambient - p.first - p.slope*tau
	left := middle
	for _, w := range p.waves {
		left += w.size * math.Sin(w.phase)
		away += math.Abs(w.size)
		bend += math.Abs(w.size) * w.omega * w.omega
	}
	left = math.Abs(left) * math.Exp(-s/tau)
	return away + left, bend + left/tau/tau, middle
}

func (m *moving) find(t float64) *piece {
	i := sort.Search(len(m.pieces), func(i int) bool { return m.pieces[i].from > t })
	return &m.pieces[max(i-1, 0)]
}

func (m *moving) fall(t float64) float64 {
	p := m.find(t)
	return m.start - p.first - p.rise(t-p.from, m.tau)
}

// crossings visits every time at which T is at the target, rising.
func (m *moving) crossings(target float64, visit func(t float64) bool) {
	last := math.Inf(-1)
	for i := range m.pieces {
		p, end := &m.pieces[i], m.end
		if i+1 < len(m.pieces) {
			end = m.pieces[i+1].from
		}
		goOn := p.roots(target-p.first, m.tau, 0, end-p.from, 0, func(s float64) bool {
			t := min(p.from+s, m.end)
			if t-last <= 1e-12*t { // where two intervals meet, it may be found in both
				return true
			}
			last = t
			return visit(t)
		})
		if !goOn {
			return
		}
	}
}

// mostHalvings ends the search for a crossing where the course only touches the target, to rounding.
const mostHalvings = 60

// roots visits the times from s0 to s1 at which the rise is at level, in their order, and reports whether to go
// on. An interval is left out if a bound shows that it has none, or solved if it is shown to rise or fall
// throughout; else it is halved.
func (p *piece) roots(level, tau, s0, s1 float64, depth int, visit func(s float64) bool) bool {
	mid, half := s0+(s1-s0)/2, (s1-s0)/2
	away, bend, middle := p.bound(s0, tau)
	line := middle + p.slope*mid - level
	if math.Abs(line) > away+math.Abs(p.slope)*half {
		return true
	}
	f := func(s float64) float64 { return p.rise(s, tau) - level }
	at, slope := f(mid), p.slopeAt(mid, tau)
	most := math.Abs(slope)*half + bend*half*half/2
	rounding := 4e-16 * (math.Abs(p.first) + math.Abs(level))
	if math.Abs(at) > most || !(most > rounding) { // it stays where it is, and cannot be said to cross anything
		return true
	}
	if math.Abs(slope) > bend*half || depth == mostHalvings || half <= 1e-15*mid {
		s, ok := root.Find(f, s0, s1, 0)
		return !ok || visit(s)
	}
	return p.roots(level, tau, s0, mid, depth+1, visit) && p.roots(level, tau, mid, s1, depth+1, visit)
}

// span returns bounds on T over the whole law.
func (m *moving) span() (low, high float64) {
	low, high = m.start, m.start
	for i := range m.pieces {
		p, end := &m.pieces[i], m.end
		if i+1 < len(m.pieces) {
			end = m.pieces[i+1].from
		}
		waves := 0.0
		for _, w := range p.waves {
			waves += 2 * math.Abs(w.size) * math.Hypot(1, w.omega*m.tau)
		}
		for _, T := range []float64{p.first, p.ambient, p.ambient + p.slope*(end-p.from)} {
			low, high = min(low, T-waves), max(high, T+waves)
		}
	}
	return low, high
}
