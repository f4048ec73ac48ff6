package wall

import (
	"math"
	"sort"
)

// A Course is a source over time, G at the given Fourier numbers and linear in between; two readings at one time are a
// step. The first is at 0; it ends with the last.
type Course struct {
	Fo, G []float64
}

func (c Course) used() bool { return len(c.Fo) > 0 }

// A track is a source with the state of every mode at its bends, so that an answer needs only the last one: T is
// g P + Σ c Φ z, where P + Σ c Φ exp(−ζ² Fo) answers to a step of 1, and z' = −ζ² z + g' (Duhamel's superposition:
// H. S. Carslaw and J. C. Jaeger, Conduction of Heat in Solids, 2nd ed., section 1.14, from memory).
type track struct {
	pieces []piece
	z      []float64 // of piece i from i·modes on
}

// A piece is a straight part of a source.
type piece struct {
	from, g, slope float64
	area           float64 // ∫ g before it
	jump           float64 // at its begin
	bend           float64 // change of the slope there
	most           float64 // largest |g| up to its end
}

func (t *track) used() bool { return len(t.pieces) > 0 }

// follow prepares a source.
func (m *Modes) follow(c Course) track {
	t := track{}
	modes := len(m.All)
	z := make([]float64, modes)
	last, slope, area, most := 0.0, 0.0, 0.0, 0.0
	for i, fo := range c.Fo {
		if i > 0 {
			if step := fo - c.Fo[i-1]; step > 0 {
				advance(m.All, z, slope, step)
				area += step * (c.G[i-1] + c.G[i]) / 2
				last = c.G[i]
			}
		}
		if i+1 < len(c.Fo) && c.Fo[i+1] == fo {
			continue // the last of the readings at a time counts
		}
		p := piece{from: fo, g: c.G[i], area: area, jump: c.G[i] - last}
		if i+1 < len(c.Fo) {
			p.slope = (c.G[i+1] - c.G[i]) / (c.Fo[i+1] - fo)
		}
		p.bend = p.slope - slope
		most = math.Max(most, math.Max(math.Abs(last), math.Abs(p.g)))
		if i+1 < len(c.Fo) {
			most = math.Max(most, math.Abs(c.G[i+1]))
		}
		p.most = most
		for n := range z {
			z[n] += p.jump
		}
		last, slope = p.g, p.slope
		t.pieces = append(t.pieces, p)
		t.z = append(t.z, z...)
	}
	return t
}

// advance moves the states along a straight part.
func advance(modes []Mode, z []float64, slope, step float64) {
	for n := range z {
		z[n] = moved(&modes[n], z[n], slope, step)
	}
}

// moved returns a state after a step along a straight part.
func moved(mode *Mode, z, slope, step float64) float64 {
	if mode.Rate == 0 {
		return z + slope*step
	}
	gain := -math.Expm1(-mode.Rate * step)
	return z*(1-gain) + slope*gain/mode.Rate
}

// at returns the piece at a time.
func (t *track) at(fo float64) int {
	return max(0, sort.Search(len(t.pieces), func(i int) bool { return t.pieces[i].from > fo })-1)
}

// highest returns the largest |g| up to a time, about.
func (t *track) highest(fo float64) float64 {
	if !t.used() {
		return 0
	}
	return t.pieces[t.at(fo)].most
}

// heated returns what the source gives to a quantity.
func (s *Solution) heated(p Probe, fo float64) float64 {
	t := &s.source
	i := t.at(fo)
	part := &t.pieces[i]
	age := fo - part.from
	height := part.g + part.slope*age
	total := s.unit.base(p, height, part.area+age*(part.g+height)/2)
	modes := len(s.Modes.All)
	z := t.z[i*modes : (i+1)*modes]
	for n := range s.unit.c {
		if c := s.unit.c[n]; c != 0 {
			mode := &s.Modes.All[n]
			total += c * s.weight(p, mode) * moved(mode, z[n], part.slope, age)
		}
	}
	// what the modes left out still feel of a step
	for ; i >= 0 && fo-t.pieces[i].from < s.Join; i-- {
		if jump := t.pieces[i].jump; jump != 0 {
			age := fo - t.pieces[i].from
			total += jump * (s.early(Drive{G: 1}, p, age) - s.late(&s.unit, p, age))
		}
	}
	return total
}

// missing bounds what the modes left out would add to a temperature: at most 2/ζ³ each for a step that is not
// accounted for, and 2/ζ⁵ for a bend.
func (t *track) missing(s *Solution, fo float64) float64 {
	if !t.used() {
		return 0
	}
	bends := 0.0
	least, most := math.Inf(1), math.Inf(-1)
	for i := t.at(fo); i >= 0; i-- {
		p := &t.pieces[i]
		if fo-p.from < s.Join {
			bends += math.Abs(p.bend)
		}
		least, most = math.Min(least, p.g), math.Max(most, p.g)
		if fo-p.from >= s.Join {
			break
		}
	}
	n := math.Pi * float64(len(s.Modes.All)-1)
	return math.Min(bends/(2*math.Pi*n*n*n*n), (most-least)/(math.Pi*n*n))
}
