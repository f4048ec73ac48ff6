package surface

import (
	"math"

	"example.com/coolward/correlations"
	"example.com/coolward/internal/pow"
)

// A band of a group in which one correlation hands over to another. Both hold within it.
type band struct {
	low, high float64
	octaves   float64 // from low to high
	name      string
}

func newBand(low, high float64, name string) band {
	return band{low, high, math.Log2(high / low), name}
}

// weight returns the weight of the one that takes over, by the logarithm of the group.
func (b *band) weight(f *Film, x float64) float64 {
	if !(x > b.low) {
		return 0
	}
	if x >= b.high {
		return 1
	}
	if f.Handover == "" {
		f.Handover = b.name
	} else {
		f.Handover = joined[f.Handover]
	}
	return ramp(pow.Log2(x/b.low) / b.octaves)
}

// The bands are our own choice. That of a ball in a stream is by the Reynolds number of the free stream, on which the wall has no
// influence; the others are by groups at the film temperature.
var (
	ballStream = newBand(3.5, 7, "Clift, Grace and Weber to Whitaker, Re 3.5 to 7")
	bodyTall   = newBand(1e7, 1e8, "Yovanovich to Churchill and Chu, Ra 1e7 to 1e8 on the square root of the surface")
	plateLow   = newBand(1e4, 1e5, "Yovanovich to horizontal plate, Ra 1e4 to 1e5")
	// As narrow as the digits of the transition admit both.
	plateStream = newBand(4.6e5, 5.4e5, "laminar plate to laminar then turbulent plate, Re 4.6e5 to 5.4e5")
	plateJump   = newBand(5e6, 2e7, "between the branches of the horizontal plate, Ra 5e6 to 2e7")
)

// joined has the names of two bands that a film can be in at once: one of natural convection, and that of the stream along a plate.
var joined = map[string]string{
	plateLow.name:  plateLow.name + "; " + plateStream.name,
	plateJump.name: plateJump.name + "; " + plateStream.name,
}

// What correlations give at rest.
const (
	ballRest           = 2
	levelCylinderRest  = 0.36          // Churchill and Chu
	cylinderStreamRest = 0.3           // Churchill and Bernstein
	uprightPlateRest   = 0.825 * 0.825 // Churchill and Chu
	standInScatter     = 0.10          // added to the scatter of an upright plate that stands for another body
	inclinedScatter    = 0.10          // added to the scatter of an upright plate that is inclined
)

// choose puts the correlations that suit the groups on the list of f and adds up their parts in m.
func (c *Convection) choose(f *Film, s *surroundings, m *mode) error {
	if c.Insist != (correlations.Correlation{}) {
		return c.insist(f, s, m)
	}
	var err error
	switch s.form {
	case ballForm:
		err = c.use(f, s, m, &application{with: correlations.ChurchillSphere(), weight: 1, length: s.lengths.natural, rest: ballRest})
	case levelCylinder:
		err = c.use(f, s, m, &application{with: correlations.ChurchillChuCylinder(), weight: 1, length: s.lengths.natural, rest: levelCylinderRest})
	case uprightPlate:
		a := &application{with: correlations.ChurchillChuPlate(), weight: 1, length: s.lengths.natural, rest: uprightPlateRest}
		if c.Inclination.SI() != 0 {
			a.scatter = inclinedScatter
		}
		err = c.use(f, s, m, a)
	case uprightCylinder:
		err = c.tall(f, s, m, s.lengths.natural, 0)
	case compactBody:
		err = c.tall(f, s, m, s.lengths.height, compactScatter)
	case levelPlate:
		err = c.levelPlate(f, s, m)
	}
	if err != nil || f.Re == 0 {
		return err
	}
	a := &application{weight: 1, length: s.lengths.stream}
	switch s.form {
	case ballForm:
		return c.ballStream(f, s, m)
	case levelCylinder, uprightCylinder:
		a.with, a.rest = correlations.ChurchillBernsteinCylinder(), cylinderStreamRest
	case uprightPlate, levelPlate:
		return c.plateStream(f, s, m)
	case compactBody:
		a.with, a.rest, a.scatter = correlations.YovanovichVanoverbekeBody(), s.lengths.rest, compactScatter
	}
	return c.use(f, s, m, a)
}

// insist uses the one correlation that the caller names, on the length of the body that its regime is on.
func (c *Convection) insist(f *Film, s *surroundings, m *mode) error {
	a := &application{with: c.Insist, weight: 1, length: s.lengths.natural}
	if c.Insist.Regime() == correlations.Forced {
		a.length = s.lengths.stream
	}
	if c.Insist == correlations.YovanovichBody() && s.lengths.body > 0 {
		a.length = s.lengths.body
	}
	if s.form == ballForm {
		a.rest = ballRest
	}
	return c.use(f, s, m, a)
}

// ballStream is the stream past a ball: Clift, Grace and Weber hand over to Whitaker.
func (c *Convection) ballStream(f *Film, s *surroundings, m *mode) error {
	w := ballStream.weight(f, f.Re)
	if w < 1 {
		if err := c.use(f, s, m, &application{with: correlations.CliftSphere(), weight: 1 - w, length: s.lengths.stream, rest: ballRest}); err != nil {
			return err
		}
	}
	if w == 0 {
		return nil
	}
	return c.use(f, s, m, &application{with: correlations.WhitakerSphere(), weight: w, length: s.lengths.stream, rest: ballRest})
}

// plateStream is the stream along a plate, laminar from a sharp edge on.
func (c *Convection) plateStream(f *Film, s *surroundings, m *mode) error {
	w := plateStream.weight(f, c.Speed.SI()*s.lengths.stream/s.film.nu)
	if w < 1 {
		if err := c.use(f, s, m, &application{with: correlations.PlateLaminar(), weight: 1 - w, length: s.lengths.stream}); err != nil {
			return err
		}
	}
	if w == 0 {
		return nil
	}
	return c.use(f, s, m, &application{with: correlations.PlateMixed(), weight: w, length: s.lengths.stream})
}

// tall is natural convection of a body of that height by its gravity function, and by an upright plate as high where the flow
// turns turbulent.
func (c *Convection) tall(f *Film, s *surroundings, m *mode, height, scatter float64) error {
	l := s.lengths.body
	w := bodyTall.weight(f, s.rayleigh*math.Abs(s.film.beta)*l*l*l)
	if w < 1 {
		if err := c.use(f, s, m, &application{with: correlations.YovanovichBody(), weight: 1 - w, length: l, rest: s.lengths.rest, scatter: scatter}); err != nil {
			return err
		}
	}
	if w == 0 {
		return nil
	}
	return c.use(f, s, m, &application{with: correlations.ChurchillChuPlate(), weight: w, length: height, rest: uprightPlateRest, scatter: standInScatter})
}

// levelPlate is natural convection of the faces of a level plate: the active one, from which the fluid rises if it is hot and
// sinks if it is cold, and the calm one. The flow of both begins by Yovanovich's correlation, which is linear in the body
// gravity function, so that the mean of the faces stands for both.
func (c *Convection) levelPlate(f *Film, s *surroundings, m *mode) error {
	active, calm := c.faces()
	if s.lift < 0 {
		active, calm = calm, active
	}
	share, gravity := 1.0, activeGravity
	switch {
	case active && calm:
		share, gravity = 0.5, (activeGravity+calmGravity)/2
	case calm:
		gravity = calmGravity
	}
	w := plateLow.weight(f, f.Ra)
	if w < 1 {
		if err := c.use(f, s, m, &application{
			with: correlations.YovanovichBody(), weight: 1 - w, length: s.lengths.body, rest: s.lengths.rest, gravity: gravity, scatter: standInScatter,
		}); err != nil {
			return err
		}
	}
	if w > 0 && active {
		if err := c.activeFace(f, s, m, share*w); err != nil {
			return err
		}
	}
	if w > 0 && calm {
		return c.use(f, s, m, &application{with: correlations.RadziemskaPlateDown(), weight: share * w, length: s.lengths.natural})
	}
	return nil
}

// activeFace is the active face of a level plate.
func (c *Convection) activeFace(f *Film, s *surroundings, m *mode, weight float64) error {
	a := &application{with: correlations.HorizontalPlateUp(), weight: weight, length: s.lengths.natural}
	v := plateJump.weight(f, f.Ra)
	if v == 0 || v == 1 {
		return c.use(f, s, m, a)
	}
	// The branches of the correlation itself, which jumps by 6 % at 1e7.
	a.weight, a.atRayleigh, a.scaledFor = weight*(1-v), plateJump.low, 1.0/4
	if err := c.use(f, s, m, a); err != nil {
		return err
	}
	a.weight, a.atRayleigh, a.scaledFor = weight*v, plateJump.high, 1.0/3
	return c.use(f, s, m, a)
}

// candidates lists the correlations that the choice for the form is made among: those of natural convection, and in a stream those of
// forced convection too.
func (c *Convection) candidates() []correlations.Correlation {
	var natural, forced []correlations.Correlation
	switch c.form() {
	case ballForm:
		natural = []correlations.Correlation{correlations.ChurchillSphere()}
		forced = []correlations.Correlation{correlations.WhitakerSphere(), correlations.CliftSphere()}
	case levelCylinder:
		natural = []correlations.Correlation{correlations.ChurchillChuCylinder()}
		forced = []correlations.Correlation{correlations.ChurchillBernsteinCylinder()}
	case uprightCylinder:
		natural = []correlations.Correlation{correlations.YovanovichBody(), correlations.ChurchillChuPlate()}
		forced = []correlations.Correlation{correlations.ChurchillBernsteinCylinder()}
	case uprightPlate:
		natural = []correlations.Correlation{correlations.ChurchillChuPlate()}
		forced = []correlations.Correlation{correlations.PlateLaminar(), correlations.PlateMixed()}
	case levelPlate:
		natural = []correlations.Correlation{correlations.YovanovichBody(), correlations.HorizontalPlateUp(), correlations.RadziemskaPlateDown()}
		forced = []correlations.Correlation{correlations.PlateLaminar(), correlations.PlateMixed()}
	case compactBody:
		natural = []correlations.Correlation{correlations.YovanovichBody(), correlations.ChurchillChuPlate()}
		forced = []correlations.Correlation{correlations.YovanovichVanoverbekeBody()}
	}
	if c.Speed.SI() > 0 {
		return append(forced, natural...)
	}
	return natural
}
