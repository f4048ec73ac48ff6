package surface

import (
	"math"

	"example.com/coolward/correlations"
	"example.com/coolward/units"
)

// The hand-over from Ranz and Marshall to Whitaker in gases, by the Reynolds number of the free
// stream, on which the wall has no influence. Both hold within the band.
const (
	handoverLow  = 3.5
	handoverHigh = 7.0
	handover     = "Ranz and Marshall to Whitaker, Re 3.5 to 7"
)

// A part of h may lie outside the range of its correlation if h changes by less than negligible when
// that part is taken margin times as large as the formula gives it there. Both are our own choice.
// The same fraction decides which regime a film is named after.
const (
	negligible = 0.01
	margin     = 3
)

// surroundings are the fluid around one wall temperature and what its groups are made from.
type surroundings struct {
	length         float64 // m
	film, stream   state
	ratio          float64 // viscosity ratio, 1 in gases
	filmRe         float64 // Reynolds number at the film temperature
	rayleigh       float64 // Rayleigh number over |β|, K
	wallBeta       float64 // β at the wall, 1/K; in liquids only
	densityExtreme bool    // the density is greatest or least between wall and ambient
}

func (c *Convection) film(f *Film, wall units.Temperature) error {
	if err := c.check(); err != nil {
		return err
	}
	if err := units.CheckTemperature("convection: wall", wall); err != nil {
		return err
	}
	f.Temperature = units.Kelvin.Of(wall.SI()/2 + c.Ambient.SI()/2)
	var s surroundings
	if err := c.surround(&s, f.Temperature, wall); err != nil {
		return err
	}
	gravity := c.Gravity.SI()
	if gravity == 0 {
		gravity = standardGravity
	}
	beta := math.Abs(s.film.beta)
	grashof := gravity * math.Abs(wall.SI()-c.Ambient.SI()) * s.length * s.length * s.length / (s.film.nu * s.film.nu)
	f.Pr = s.film.pr
	f.Gr = grashof * beta
	s.rayleigh = grashof * f.Pr
	f.Ra = s.rayleigh * beta
	f.Re = c.Speed.SI() * s.length / s.stream.nu
	s.filmRe = c.Speed.SI() * s.length / s.film.nu

	m := mode{conductance: s.film.k / s.length}
	if err := c.choose(f, &s, &m); err != nil {
		return err
	}
	b, err := m.blend()
	if err != nil {
		return err
	}
	if err := c.judge(f, &s, &m, b.h); err != nil {
		return err
	}
	f.Regime = m.regime(b.h)
	f.Nu, f.Scatter = b.nu, b.scatter
	f.ConductionShare, f.ForcedShare, f.NaturalShare = b.conduction, b.forced, b.natural
	f.Coefficient = units.WattPerSquareMetreKelvin.Of(b.h * (1 + float64(c.limit)*b.scatter))
	return units.CheckPositive("convection: heat transfer coefficient", f.Coefficient)
}

// surround evaluates the fluid where the correlations need it: at the film temperature; at ambient in
// a stream; and in a liquid at the wall too.
func (c *Convection) surround(s *surroundings, film, wall units.Temperature) (err error) {
	s.length = c.Body.FlowLength().SI()
	if err = c.at(&s.film, film); err != nil {
		return err
	}
	s.stream, s.ratio = s.film, 1
	if s.film.gas && c.Speed.SI() == 0 {
		return nil
	}
	if err = c.at(&s.stream, c.Ambient); err != nil || s.film.gas {
		return err
	}
	var w state
	if err = c.at(&w, wall); err != nil {
		return err
	}
	s.ratio = s.stream.mu / w.mu
	s.wallBeta = w.beta
	s.densityExtreme = w.beta < 0 && s.stream.beta > 0 || w.beta > 0 && s.stream.beta < 0
	return nil
}

// choose puts the correlations that suit the groups on the list of f and adds up their parts in m.
func (c *Convection) choose(f *Film, s *surroundings, m *mode) error {
	if c.Insist != (correlations.Correlation{}) {
		return c.use(f, s, m, c.Insist, 1)
	}
	if err := c.use(f, s, m, correlations.ChurchillSphere(), 1); err != nil || f.Re == 0 {
		return err
	}
	w := 1.0
	if s.film.gas {
		w = ramp(math.Log(f.Re/handoverLow) / math.Log(handoverHigh/handoverLow))
	}
	if w < 1 {
		if err := c.use(f, s, m, correlations.RanzMarshallSphere(), 1-w); err != nil {
			return err
		}
	}
	if w == 0 {
		return nil
	}
	if w < 1 {
		f.Handover = handover
	}
	return c.use(f, s, m, correlations.WhitakerSphere(), w)
}

// ramp rises from 0 at x = 0 to 1 at x = 1 with no slope at either end.
func ramp(x float64) float64 {
	x = min(max(x, 0), 1)
	return x * x * (3 - 2*x)
}

// use evaluates one correlation, in its range or not, and adds its part to m. A use outside its range
// is marked negligible until it is judged.
func (c *Convection) use(f *Film, s *surroundings, m *mode, with correlations.Correlation, weight float64) error {
	x, re := s.reference(f, with)
	g := correlations.Groups{Re: re, Pr: x.pr, Ra: f.Ra, ViscosityRatio: s.ratio}
	r, err := with.Extrapolate(g)
	if err != nil {
		return err
	}
	out := r.Extrapolated || s.densityExtreme && with.Regime() == correlations.Natural
	f.used[f.count] = Use{Correlation: with, Groups: g, Nu: r.Nu, Weight: weight, Negligible: out}
	f.count++
	m.add(with.Regime(), weight, r.Nu-2, x.k/s.length, r.Scatter)
	return nil
}

// reference returns the fluid at the reference temperature of a correlation, and the Reynolds number there.
func (s *surroundings) reference(f *Film, with correlations.Correlation) (x *state, re float64) {
	if with.Reference() == correlations.FreeStream {
		return &s.stream, f.Re
	}
	return &s.film, s.filmRe
}

// judge decides on every use outside its range: negligible, extrapolated as the caller asks, or an error.
func (c *Convection) judge(f *Film, s *surroundings, m *mode, h float64) error {
	for i := range f.used[:f.count] {
		u := &f.used[i]
		if !u.Negligible {
			continue
		}
		bound, err := s.bound(f, m, u)
		if err == nil && math.Abs(bound-h) < negligible*h {
			continue
		}
		u.Negligible = false
		if !c.Extrapolate {
			return s.outside(u)
		}
		f.Extrapolated = true
	}
	return nil
}

// bound returns h as it were with the part of u larger by the margin. Where the density has an extreme
// between wall and ambient the part is first taken as large as the largest of the expansion
// coefficients would make it.
func (s *surroundings) bound(f *Film, m *mode, u *Use) (h float64, err error) {
	g := u.Groups
	if s.densityExtreme {
		g.Ra = s.rayleigh * max(math.Abs(s.wallBeta), math.Abs(s.stream.beta), math.Abs(s.film.beta))
	}
	r, err := u.Correlation.Extrapolate(g)
	if err != nil {
		return 0, err
	}
	x, _ := s.reference(f, u.Correlation)
	larger := *m
	larger.side(u.Correlation.Regime()).h += u.Weight * (margin*(r.Nu-2) - (u.Nu - 2)) * x.k / s.length
	b, err := larger.blend()
	return b.h, err
}

// outside returns the range error of a use.
func (s *surroundings) outside(u *Use) error {
	if _, err := u.Correlation.Nu(u.Groups); err != nil {
		return err
	}
	return &units.RangeError{
		Model:    u.Correlation.Name(),
		Quantity: "ratio of the expansion coefficients at the wall and at ambient, between which the density has an extreme,",
		Value:    units.Number(s.wallBeta / s.stream.beta),
		Min:      units.Number(0),
		Max:      units.Number(math.Inf(1)),
		Source:   u.Correlation.Citation(),
	}
}
