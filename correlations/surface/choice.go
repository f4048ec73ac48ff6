package surface

import (
	"math"

	"example.com/coolward/correlations"
	"example.com/coolward/internal/pow"
	"example.com/coolward/units"
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
	form           form
	lengths        lengths
	film, stream   state
	ratio          float64 // viscosity ratio, 1 in gases
	prandtlRatio   float64 // Prandtl ratio, 1 in gases
	warmth         float64 // temperature ratio
	rayleigh       float64 // Rayleigh number at the film temperature over |β| and the cube of its length, K/m³
	lift           float64 // above 0 where the fluid rises at the wall, below 0 where it sinks
	wallBeta       float64 // β at the wall, 1/K; in liquids only
	densityExtreme bool    // the density is greatest or least between wall and ambient
}

func (c *Convection) film(f *Film, s *surroundings, wall units.Temperature) error {
	s.form = c.form()
	if err := c.checkAs(s.form); err != nil {
		return err
	}
	if err := units.CheckTemperature("convection: wall", wall); err != nil {
		return err
	}
	f.Temperature = units.Kelvin.Of(wall.SI()/2 + c.Ambient.SI()/2)
	if err := c.surround(s, f.Temperature, wall); err != nil {
		return err
	}
	c.lengths(&s.lengths, s.form)
	l := s.lengths.natural
	gravity := c.Gravity.SI()
	if gravity == 0 {
		gravity = standardGravity
	}
	if c.Inclination.SI() != 0 && c.Insist == (correlations.Correlation{}) { // one that is insisted on knows the inclination
		gravity *= math.Cos(c.Inclination.SI())
	}
	difference := wall.SI() - c.Ambient.SI()
	grashof := gravity * math.Abs(difference) / (s.film.nu * s.film.nu)
	beta := math.Abs(s.film.beta)
	f.Length, f.StreamLength = units.Metre.Of(l), units.Metre.Of(s.lengths.stream)
	f.Pr = s.film.pr
	f.Gr = grashof * beta * l * l * l
	f.Ra = f.Gr * f.Pr
	f.Re = c.Speed.SI() * s.lengths.stream / s.stream.nu
	s.rayleigh = grashof * f.Pr
	s.lift = difference * s.film.beta
	s.warmth = f.Temperature.SI() / c.Ambient.SI()

	f.shared = correlations.Groups{
		ViscosityRatio: s.ratio, PrandtlRatio: s.prandtlRatio, TemperatureRatio: s.warmth,
		TransitionRe: usualTransition, Inclination: c.Inclination, Slenderness: s.lengths.slenderness,
		BodyNu: s.lengths.rest, Perimeter: compactReach,
	}
	m := mode{opposed: c.opposed(s)}
	if err := c.choose(f, s, &m); err != nil {
		return err
	}
	b, err := m.blend()
	if err != nil {
		return err
	}
	if err := c.judge(f, s, &m, b.h); err != nil {
		return err
	}
	f.Regime = m.regime(b.h)
	f.Opposed, f.Alike = m.opposed, b.alike
	f.Nu, f.Scatter = b.h*l/b.conductivity, b.scatter
	f.ConductionShare, f.ForcedShare, f.NaturalShare = b.conduction, b.forced, b.natural
	f.Coefficient = units.WattPerSquareMetreKelvin.Of(b.h * (1 + float64(c.limit)*b.scatter))
	return units.CheckPositive("convection: heat transfer coefficient", f.Coefficient)
}

// surround evaluates the fluid where the correlations need it: at the film temperature; at ambient in
// a stream; and in a liquid at the wall too.
func (c *Convection) surround(s *surroundings, film, wall units.Temperature) (err error) {
	if err = c.at(&s.film, film); err != nil {
		return err
	}
	s.ratio, s.prandtlRatio = 1, 1
	if s.film.gas && c.Speed.SI() == 0 {
		s.stream = s.film
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
	s.prandtlRatio = s.stream.pr / w.pr
	s.wallBeta = w.beta
	s.densityExtreme = w.beta < 0 && s.stream.beta > 0 || w.beta > 0 && s.stream.beta < 0
	return nil
}

// An application is a correlation at work: with which weight, on which length, what of it is there at rest, and what our own
// choices add to its scatter. One that is evaluated at another Rayleigh number than that of the body is scaled from there.
type application struct {
	with                  correlations.Correlation
	weight, length        float64
	rest, scatter         float64
	gravity               float64 // 0 is that of the body
	atRayleigh, scaledFor float64
}

// ramp rises from 0 at x = 0 to 1 at x = 1 with no slope at either end.
func ramp(x float64) float64 {
	x = min(max(x, 0), 1)
	return x * x * (3 - 2*x)
}

// use evaluates one correlation, in its range or not, and adds its part to m. A use outside its range
// is marked negligible until it is judged.
func (c *Convection) use(f *Film, s *surroundings, m *mode, a *application) error {
	x := s.reference(a.with)
	u := &f.used[f.count]
	u.with, u.weight, u.length, u.rest, u.scale, u.gravity = a.with, a.weight, a.length, a.rest, 1, s.lengths.gravity
	u.re, u.pr, u.ra = c.Speed.SI()*a.length/x.nu, x.pr, s.rayleigh*math.Abs(s.film.beta)*a.length*a.length*a.length
	if a.gravity != 0 {
		u.gravity = a.gravity
	}
	if a.atRayleigh != 0 {
		u.scale = pow.Of(u.ra/a.atRayleigh, a.scaledFor)
		u.ra = a.atRayleigh
	}
	g := &f.shared // what belongs to one use is overwritten by the next
	g.Re, g.Pr, g.Ra, g.Gravity = u.re, u.pr, u.ra, u.gravity
	r, err := a.with.Extrapolate(*g)
	if err != nil {
		return err
	}
	u.nu = r.Nu * u.scale
	u.negligible = r.Extrapolated && !f.towardsRest(u) || s.densityExtreme && a.with.Regime() == correlations.Natural
	f.count++
	excess := u.nu - a.rest
	if math.Abs(excess) < 1e-12*a.rest { // rounding
		excess = 0
	}
	m.add(a.with.Regime(), a.weight, excess, a.rest, x.k, a.length, r.Scatter+a.scatter)
	return nil
}

// towardsRest reports whether a use is out of range by nothing but a Rayleigh number between 0, for which its correlation is
// defined, and the lowest published one. There it falls steadily to what it gives at rest.
func (f *Film) towardsRest(u *use) bool {
	g := f.groups(u)
	g.Ra = 0
	if u.ra == 0 || !u.with.Admits(g) {
		return false
	}
	for r := range u.with.Ranges() {
		if r.Group == correlations.Rayleigh && u.ra < r.Min.Value() {
			g.Ra = r.Min.Value()
			return u.with.Admits(g)
		}
	}
	return false
}

// reference returns the fluid at the reference temperature of a correlation.
func (s *surroundings) reference(with correlations.Correlation) *state {
	if with.Reference() == correlations.FreeStream {
		return &s.stream
	}
	return &s.film
}

// judge decides on every use outside its range: negligible, extrapolated as the caller asks, or an error.
func (c *Convection) judge(f *Film, s *surroundings, m *mode, h float64) error {
	for i := range f.used[:f.count] {
		u := &f.used[i]
		if !u.negligible {
			continue
		}
		bound, err := s.bound(f, m, u)
		if err == nil && math.Abs(bound-h) < negligible*h {
			continue
		}
		u.negligible = false
		if !c.Extrapolate {
			return s.outside(f, u)
		}
		f.Extrapolated = true
	}
	return nil
}

// bound returns h as it were with the part of u larger by the margin. Where the density has an extreme
// between wall and ambient the part is first taken as large as the largest of the expansion
// coefficients would make it.
func (s *surroundings) bound(f *Film, m *mode, u *use) (h float64, err error) {
	g, l := f.groups(u), u.length
	if s.densityExtreme {
		g.Ra = s.rayleigh * l * l * l * max(math.Abs(s.wallBeta), math.Abs(s.stream.beta), math.Abs(s.film.beta))
	}
	r, err := u.with.Extrapolate(g)
	if err != nil {
		return 0, err
	}
	larger := *m
	larger.side(u.with.Regime()).h += u.weight * (margin*(u.scale*r.Nu-u.rest) - (u.nu - u.rest)) * s.reference(u.with).k / l
	b, err := larger.blend()
	return b.h, err
}

// outside returns the range error of a use.
func (s *surroundings) outside(f *Film, u *use) error {
	if _, err := u.with.Nu(f.groups(u)); err != nil {
		return err
	}
	return &units.RangeError{
		Model:    u.with.Name(),
		Quantity: "ratio of the expansion coefficients at the wall and at ambient, between which the density has an extreme,",
		Value:    units.Number(s.wallBeta / s.stream.beta),
		Min:      units.Number(0),
		Max:      units.Number(math.Inf(1)),
		Source:   u.with.Citation(),
	}
}
