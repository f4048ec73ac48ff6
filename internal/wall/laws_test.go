package wall

import (
	"fmt"
	"math"
	"math/rand"
	"testing"
)

// random returns a problem of any body and conditions, without a start of its own.
func random(r *rand.Rand) Problem {
	b := []Body{Plate(), Hollow(1, math.Exp(r.NormFloat64()*3)), Hollow(2, math.Exp(r.NormFloat64()*3)), Solid(1), Solid(2)}[r.Intn(5)]
	h := func() float64 {
		switch r.Intn(5) {
		case 0:
			return 0
		case 1:
			return math.Inf(1)
		}
		return math.Exp(r.NormFloat64() * 3)
	}
	p := Problem{Body: b, Ha: h(), Hb: h()}
	if b.Solid {
		p.Ha = 0
	}
	p.Drive = Drive{G: r.NormFloat64()}
	if p.Ha == 0 {
		p.Drive.Qa = r.NormFloat64()
		if b.Solid {
			p.Drive.Qa = 0
		}
	} else {
		p.Drive.Ua = r.NormFloat64()
	}
	if p.Hb == 0 {
		p.Drive.Qb = r.NormFloat64()
	} else {
		p.Drive.Ub = r.NormFloat64()
	}
	return p
}

func (p Problem) String() string {
	return fmt.Sprintf("m %d, Ra %.4g, solid %v, H %.4g and %.4g, %+v", p.Body.Dimension, p.Body.Ra, p.Body.Solid, p.Ha, p.Hb, p.Drive)
}

var quantities = []Probe{{Y: 0}, {Y: 0.02}, {Y: 0.5}, {Y: 0.97}, {Y: 1}, {Quantity: Mean}, {Quantity: InnerFlux}, {Quantity: OuterFlux}, {Quantity: InnerHeat}, {Quantity: OuterHeat}}

// Where the form for short times hands over to the modes, both agree: two representations with nothing in common.
func TestHandover(t *testing.T) {
	r := rand.New(rand.NewSource(1))
	for range 300 {
		p := random(r)
		s := Solve(p)
		fo := s.Join
		for _, probe := range quantities {
			if p.Body.Solid && (probe.Quantity == InnerFlux || probe.Quantity == InnerHeat) {
				continue
			}
			early, late := s.early(p.Drive, probe, fo), s.late(&s.all, probe, fo)
			tolerance := s.Bound(fo) + s.Bound(fo*(1-1e-15))
			if probe.Quantity >= InnerFlux {
				tolerance = 1e-10*(math.Abs(early)+1) + s.Bound(fo*(1-1e-15))/math.Sqrt(fo)
			}
			if math.Abs(early-late) > tolerance {
				t.Errorf("%v, %+v: %.16g early, %.16g late, off by %.2g, tolerance %.2g", p, probe, early, late, early-late, tolerance)
			}
		}
	}
}

// The mean falls by what has left, less what was set free.
func TestBalance(t *testing.T) {
	r := rand.New(rand.NewSource(2))
	for i := range 120 {
		p := random(r)
		if i%2 == 0 {
			p.Start = func(y float64) float64 { return 1 + y - 2*y*y*y }
		}
		if i%3 == 0 {
			p.Source = Course{Fo: []float64{0, 0.1, 0.1, 0.5, 9}, G: []float64{1, 2, -1, 3, 0}}
		}
		s := Solve(p)
		volume := p.Body.Volume(1)
		for _, fo := range []float64{1e-5, 1e-3, 0.05, 0.1, 0.3, 2} {
			left := s.Ask(Probe{Quantity: OuterHeat}, fo)
			if !p.Body.Solid {
				left += p.Body.Inside() * s.Ask(Probe{Quantity: InnerHeat}, fo)
			}
			set := p.Drive.G*fo + p.Source.integral(fo)
			start := 0.0
			if p.Start != nil {
				start = p.Body.Integrate(p.Start) / volume
			}
			got, want := s.Ask(Probe{Quantity: Mean}, fo), start+set-left/volume
			tolerance := 1e-11*(s.size+math.Abs(set)+math.Abs(left)/volume) + s.Bound(fo)
			if math.Abs(got-want) > tolerance {
				t.Errorf("%v, start %v, source %v, Fo %v: mean %.15g, by the balance %.15g, off by %.2g", p, p.Start != nil, len(p.Source.Fo) > 0, fo, got, want, got-want)
			}
		}
	}
}

// integral returns ∫ g.
func (c Course) integral(fo float64) float64 {
	total := 0.0
	for i := 1; i < len(c.Fo); i++ {
		lo, hi := c.Fo[i-1], math.Min(fo, c.Fo[i])
		if hi <= lo {
			continue
		}
		at := c.G[i-1] + (c.G[i]-c.G[i-1])*(hi-lo)/(c.Fo[i]-lo)
		total += (hi - lo) * (c.G[i-1] + at) / 2
	}
	return total
}
